"""What is said of each property of air: equation, range, uncertainty, grade, sources."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.provenance import Grade, RecordUse, Trail

__all__ = ["STATEMENTS", "Statement", "gas_trail"]

_DRY: Final = "233.15 to 473.15 K (-40 to 200 degC), 10 to 1000 kPa, humid to 100 degC"
_COMPOSITION: Final = "dry air of the standard composition with 400 ppm of carbon dioxide"
_OVER_LIQUID: Final = "humidity and dew point over liquid water, also below 0 degC"
_MIXING: Final = (
    "the influence of humidity on viscosity and thermal conductivity is a prediction (Wilke's "
    "rule); no measured points of humid air were seen"
)


class Statement(NamedTuple):
    """The statement on one property; `spread` gives the relative standard uncertainty."""

    kind: str
    method: str
    form: str
    grade: Grade
    sources: tuple[str, ...]
    place: str
    spread: Callable[[Any, Any, Any], Any]
    range: str = _DRY
    obtained: str = "as published"
    assumptions: tuple[str, ...] = ()
    predicted_when_humid: bool = False
    humid_sources: tuple[str, ...] = ()


def _of_saturation(temperature: Any, pressure: Any, x: Any) -> Any:
    # 0.03 % above 0 degC (formulations agree to 0.01 %); below, two of them part by 0.6 % at -40.
    return 3e-4 + 1.5e-4 * np.maximum(273.15 - temperature, 0.0)


def _of_water(temperature: Any, pressure: Any, x: Any) -> Any:
    # The enhancement factor adds 0.1 % at 1 MPa.
    return _of_saturation(temperature, pressure, x) + 1e-9 * pressure


def _of_dew_point(temperature: Any, pressure: Any, x: Any) -> Any:
    # A relative error of a vapour pressure is about 15 times that of its temperature in kelvin.
    return _of_water(temperature, pressure, x) / 15.0


def _of_density(temperature: Any, pressure: Any, x: Any) -> Any:
    return 2e-4 + 5e-4 * x


def _of_viscosity(temperature: Any, pressure: Any, x: Any) -> Any:
    return np.hypot(0.005, 0.03 * x)


def _of_conductivity(temperature: Any, pressure: Any, x: Any) -> Any:
    return np.hypot(0.01, 0.05 * x)


STATEMENTS: Final[dict[str, Statement]] = {
    "density": Statement(
        "density", "virial equation with second and third coefficients", "virial", "reference",
        ("HylandWexler1983", "Picard2008"), "coefficients B of air, water and the pair, C of air",
        _of_density, assumptions=(_COMPOSITION,),
    ),
    "viscosity": Statement(
        "gas_viscosity", "dry air and water vapour, each by its own equation; Wilke's rule",
        "collision_integral", "single", ("LemmonJacobsen2004",), "equations 1 to 3, table of air",
        _of_viscosity, assumptions=(_COMPOSITION,), predicted_when_humid=True,
        humid_sources=("IAPWS2008viscosity", "Wilke1950"),
    ),
    "kinematic_viscosity": Statement(
        "kinematic_viscosity", "viscosity over density", "quotient", "single",
        ("LemmonJacobsen2004", "HylandWexler1983"), "as its parts", _of_viscosity,
        assumptions=(_COMPOSITION,), predicted_when_humid=True,
        humid_sources=("IAPWS2008viscosity", "Wilke1950"),
    ),
    "thermal_conductivity": Statement(
        "thermal_conductivity", "dry air and water vapour, each by its own equation; Wilke's rule",
        "collision_integral", "single", ("LemmonJacobsen2004",), "equations 4 to 6, table of air",
        _of_conductivity, assumptions=(_COMPOSITION,), predicted_when_humid=True,
        humid_sources=("IAPWS2011conductivity", "Wilke1950"),
    ),
    "heat_capacity": Statement(
        "heat_capacity", "ideal gas of both parts and the second virial coefficient",
        "planck_einstein", "single", ("Lemmon2000", "HylandWexler1983"),
        "ideal-gas part; B of air, water and the pair", lambda t, p, x: 1e-3 + 1e-2 * x,
        assumptions=(_COMPOSITION,), humid_sources=("IAPWS1995",),
    ),
    "vapour_diffusivity": Statement(
        "diffusivity", "0.2178 cm2/s (T/273.15 K)^1.81 (101325 Pa/p)", "power", "measured",
        ("Massman1998", "Welty1984"), "as recommended for water vapour",
        lambda t, p, x: 0.03 + 0.0 * x, range="273.15 to 373.15 K (0 to 100 degC), 10 to 1000 kPa",
    ),
    "mean_free_path": Statement(
        "mean_free_path", "67.30 nm at 296.15 K and 101325 Pa; viscosity sqrt(T/M)/p", "kinetic",
        "single", ("Kim2005", "LemmonJacobsen2004"), "reference value; scaled by kinetic theory",
        lambda t, p, x: np.hypot(0.015, 0.03 * x), assumptions=(
            "a mean free path is a convention: use it with a slip correction fitted on the same "
            "one (Kim et al. 2005); others in use differ by 2 %",
        ), predicted_when_humid=True, humid_sources=("IAPWS2008viscosity", "Wilke1950"),
    ),
    "molar_mass": Statement(
        "molar_mass", "mole fractions of dry air and water", "mean", "reference", ("Picard2008",),
        "molar masses", lambda t, p, x: 2e-5 + 2e-4 * x, assumptions=(_COMPOSITION,),
    ),
    "saturation_vapour_pressure": Statement(
        "vapour_pressure", "ITS-90 form of Wexler's equation", "exp_polynomial", "reference",
        ("Hardy1998",), "equation for liquid water", _of_saturation,
        range="233.15 to 373.15 K (-40 to 100 degC)", assumptions=(_OVER_LIQUID,),
    ),
    "water_mole_fraction": Statement(
        "mole_fraction", "humidity, vapour pressure and enhancement factor", "product", "reference",
        ("Hardy1998",), "equations for liquid water and enhancement factor", _of_water,
        range="233.15 to 373.15 K (-40 to 100 degC), 10 to 1000 kPa", assumptions=(_OVER_LIQUID,),
    ),
    "vapour_pressure": Statement(
        "vapour_pressure", "mole fraction times pressure", "product", "reference",
        ("Hardy1998",), "equations for liquid water and enhancement factor", _of_water,
        range="233.15 to 373.15 K (-40 to 100 degC), 10 to 1000 kPa", assumptions=(_OVER_LIQUID,),
    ),
    "dew_point": Statement(
        "temperature", "the same equations solved for the temperature", "root", "reference",
        ("Hardy1998",), "equations for liquid water and enhancement factor", _of_dew_point,
        range="173.15 to 373.15 K (-100 to 100 degC), 10 to 1000 kPa", assumptions=(_OVER_LIQUID,),
    ),
}  # fmt: skip


def gas_trail(prop: str, temperature: Any, pressure: Any, x: Any) -> Trail:
    """How a property of air was made at given conditions.

    Parameters
    ----------
    prop : str
        A key of `STATEMENTS`.
    temperature, pressure, x : float or ndarray
        The conditions [K, Pa, mole fraction of water].

    Returns
    -------
    Trail
        With the largest uncertainty of the elements.
    """
    from dropkit.properties.trails import versions

    said = STATEMENTS[prop]
    humid = bool(np.any(np.greater(x, 0.0)))
    grade: Grade = "estimated" if humid and said.predicted_when_humid else said.grade
    sources = said.sources + (said.humid_sources if humid else ())
    spreads = np.asarray(said.spread(temperature, pressure, x), dtype=float)
    spread = float(np.nanmax(spreads)) if np.isfinite(spreads).any() else None
    use = RecordUse(
        record=f"air: {prop}",
        property=prop,
        form=said.form,
        grade=grade,
        sources=sources,
        place=said.place,
        obtained=said.obtained,
        range=said.range,
        uncertainty=spread if spread is not None else float("nan"),
    )
    cautions = (_MIXING,) if grade == "estimated" else ()
    return Trail(
        quantity=prop,
        subject="humid air" if humid else "dry air",
        method=said.method,
        grade=grade,
        uncertainty=spread,
        records=(use,),
        assumptions=said.assumptions,
        cautions=cautions,
        versions=versions(),
    )
