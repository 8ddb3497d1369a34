"""thermo's named handbook methods, and none of its estimates.

thermo picks a method by itself, falls back to estimates that miss by a factor of fifty, and
extrapolates without a word. Here every method is named, rests on data that a handbook reduced, and
ends where its source ends. The coefficients are those that thermo uses; dropkit's own equation
forms evaluate them, so that arrays cost what numpy costs.
"""

from __future__ import annotations

from collections.abc import Callable, Mapping
from typing import Any, Final, NamedTuple

from dropkit.errors import EngineError
from dropkit.properties.engines.engine_types import EngineCurve, inside_liquid
from dropkit.properties.engines.handbook_forms import PPDS9
from dropkit.properties.engines.handbook_tables import (
    handbook_row,
    handbook_versions,
    molar_mass_of,
)
from dropkit.properties.equations import FORMS

__all__ = ["METHODS", "REFUSED", "HandbookMethod", "handbook_curve"]

_GAS_CONSTANT: Final = 8.31446261815324  # J/(mol K), exact in the SI
_ATMOSPHERE: Final = 101325.0  # Pa

# Methods of thermo that dropkit never uses, and why.
REFUSED: Final[dict[str, str]] = {
    "LETSOU_STIEL": "an estimate; its limits claim coverage where it misses by a factor of 50",
    "PRZEDZIECKI_SRIDHAR": "an estimate that turns negative",
    "JOBACK": "a group-contribution estimate",
    "VISWANATH_NATARAJAN_2": "rows of its table are wrong by up to 66 %",
    "VISWANATH_NATARAJAN_2E": "its row of 2-butanone is wrong by a factor of 2e7",
    "VISWANATH_NATARAJAN_3": "its row of ethanol is three times too viscous",
    "DUTT_PRASAD": "of the same book as the faulty Viswanath-Natarajan tables, unchecked",
    "SOMAYAJULU": "20 % too high for benzene and octane",
    "SOMAYAJULU2": "20 % too high for benzene and octane",
    "RACKETTFIT": "20 to 30 % off for water and ethylene glycol",
    "HTCOSTALDFIT": "20 to 30 % off for water and ethylene glycol",
    "MMSNM0FIT": "an equation of corresponding states",
    "EOS": "a cubic equation of state",
    "HEOS_FIT": "a fit to the equation of state that CoolProp evaluates itself",
    "REFPROP_FIT": "a fit to the equations that CoolProp evaluates itself",
    "COOLPROP": "asked directly, as method 'HEOS'",
    "VDI_TABULAR": "interpolates and extrapolates a coarse table",
}


class _Equation(NamedTuple):
    """A row turned into an equation form, its parameters, and the limits that its source states."""

    form: str
    parameters: dict[str, Any]
    low: float
    high: float
    critical_temperature: float | None = None
    cautions: tuple[str, ...] = ()


class HandbookMethod(NamedTuple):
    """A whitelisted method of thermo for one property.

    Parameters
    ----------
    property : str
        The word of the interface.
    method : str
        thermo's name of it.
    table : str
        The coefficient table, a key of `handbook_tables.TABLES`.
    read : callable
        Row to equation; None where the row states no usable limits or lacks a molar mass.
    uncertainty : float
        Relative standard uncertainty (k = 1) of the method: half of what 95 % of the published
        values stay below, rounded up.
    source : str
        Source key.
    place : str
        Table of the source.
    """

    property: str
    method: str
    table: str
    read: Callable[[str, Mapping[str, str]], _Equation | None]
    uncertainty: float
    source: str
    place: str


def _numbers(row: Mapping[str, str], *columns: str) -> list[float]:
    return [float(row[column] or 0.0) for column in columns]


def _stated(row: Mapping[str, str]) -> tuple[float, float] | None:
    """The limits of a row, where it has both."""
    low, high = row["Tmin"], row["Tmax"]
    return (float(low), float(high)) if low and high else None


# ------------------------------------------------ density
def _perry_density(cas: str, row: Mapping[str, str]) -> _Equation | None:
    limits, mass = _stated(row), molar_mass_of(cas)
    if limits is None or mass is None:
        return None
    c = _numbers(row, "C1", "C2", "C3", "C4")
    return _Equation("rackett", {"coefficients": c, "unit": mass}, *limits, c[2])


def _vdi_density(cas: str, row: Mapping[str, str]) -> _Equation | None:
    critical, *c = _numbers(row, "Tc", "rhoc", "A", "B", "C", "D")
    powers = {
        "coefficients": c,
        "exponents": [0.0, 0.35, 2.0 / 3.0, 1.0, 4.0 / 3.0],
        "critical_temperature": critical,
    }
    return _between_melting_and_boiling(cas, "critical_powers", powers, critical)


# ------------------------------------------------ viscosity
def _dippr101(cas: str, row: Mapping[str, str]) -> _Equation | None:
    limits = _stated(row)
    c = _numbers(row, "C1", "C2", "C3", "C4", "C5")
    return None if limits is None else _Equation("dippr101", {"coefficients": c}, *limits)


def _vdi_viscosity(cas: str, row: Mapping[str, str]) -> _Equation | None:
    c = _numbers(row, "A", "B", "C", "D", "E")
    return _between_melting_and_boiling(cas, "ppds9", {"coefficients": c}, None)


# ------------------------------------------------ surface tension
def _mulero(cas: str, row: Mapping[str, str]) -> _Equation | None:
    limits = _stated(row)
    critical, *c = _numbers(row, "Tc", "sigma0", "n0", "sigma1", "n1", "sigma2", "n2")
    terms = [(s, n) for s, n in zip(c[::2], c[1::2], strict=True) if s]
    parameters = {
        "coefficients": [s for s, _ in terms],
        "exponents": [n for _, n in terms],
        "critical_temperature": critical,
    }
    if limits is None:
        return None
    return _Equation("critical_powers", parameters, *limits, critical)


def _jasper(cas: str, row: Mapping[str, str]) -> _Equation | None:
    limits = _stated(row)
    at_zero, slope = _numbers(row, "a", "b")
    line = {"coefficients": [at_zero, -slope], "centre": 273.15, "unit": 1e-3}
    caution = (
        "the limits are those of the copy, mostly melting and boiling point; Jasper's measured "
        "temperatures are not carried"
    )
    if limits is None or at_zero - slope * (limits[1] - 273.15) <= 0.0:
        return None
    return _Equation("polynomial", line, *limits, None, (caution,))


def _vdi_surface_tension(cas: str, row: Mapping[str, str]) -> _Equation | None:
    melting, critical, *c = _numbers(row, "Tm", "Tc", "A", "B", "C", "D", "E")
    parameters = {"coefficients": c, "critical_temperature": critical}
    return _Equation("watson", parameters, melting, critical, critical)


# ------------------------------------------------ vapour
def _wagner(row: Mapping[str, str], exponents: list[float]) -> dict[str, Any]:
    critical, pressure, *c = _numbers(row, "Tc", "Pc", "A", "B", "C", "D")
    return {
        "coefficients": c,
        "exponents": exponents,
        "critical_temperature": critical,
        "critical_pressure": pressure,
    }


def _mcgarry(cas: str, row: Mapping[str, str]) -> _Equation | None:
    if not row["Tmin"]:
        return None
    low, critical = _numbers(row, "Tmin", "Tc")
    return _Equation("wagner", _wagner(row, [1.0, 1.5, 3.0, 6.0]), low, critical, critical)


def _vdi_vapour_pressure(cas: str, row: Mapping[str, str]) -> _Equation | None:
    melting, critical = _numbers(row, "Tm", "Tc")
    return _Equation("wagner", _wagner(row, [1.0, 1.5, 2.5, 5.0]), melting, critical, critical)


def _perry_heat_of_vaporisation(cas: str, row: Mapping[str, str]) -> _Equation | None:
    limits, mass = _stated(row), molar_mass_of(cas)
    if limits is None or mass is None:
        return None
    critical, *c = _numbers(row, "Tc", "C1", "C2", "C3", "C4")
    parameters = {"coefficients": c, "critical_temperature": critical, "unit": 1.0 / mass}
    return _Equation("watson", parameters, *limits, critical)


def _vdi_heat_of_vaporisation(cas: str, row: Mapping[str, str]) -> _Equation | None:
    critical, mass, *c = _numbers(row, "Tc", "MW", "A", "B", "C", "D", "E")
    powers = {
        "coefficients": c,
        "exponents": [1.0 / 3.0, 2.0 / 3.0, 1.0, 2.0, 6.0],
        "critical_temperature": critical,
        "factor": _GAS_CONSTANT * critical,
        "unit": 1e3 / mass,
    }
    return _between_melting_and_boiling(cas, "critical_powers", powers, critical)


# ------------------------------------------------ the rest
def _perry_heat_capacity(cas: str, row: Mapping[str, str]) -> _Equation | None:
    limits, mass = _stated(row), molar_mass_of(cas)
    if limits is None or mass is None:
        return None
    c = _numbers(row, "A", "B", "C", "D", "E")
    return _Equation("polynomial", {"coefficients": c, "unit": 1e-3 / mass}, *limits)


def _perry_conductivity(cas: str, row: Mapping[str, str]) -> _Equation | None:
    limits = _stated(row)
    c = _numbers(row, "C1", "C2", "C3", "C4", "C5")
    return None if limits is None else _Equation("polynomial", {"coefficients": c}, *limits)


def _vdi_conductivity(cas: str, row: Mapping[str, str]) -> _Equation | None:
    c = _numbers(row, "A", "B", "C", "D", "E")
    return _between_melting_and_boiling(cas, "polynomial", {"coefficients": c}, None)


def _crc_permittivity(cas: str, row: Mapping[str, str]) -> _Equation | None:
    limits = _stated(row)
    c = _numbers(row, "A", "B", "C", "D")
    return (
        None
        if limits is None or not c[0]
        else _Equation("polynomial", {"coefficients": c}, *limits)
    )


def _between_melting_and_boiling(
    cas: str, form: str, parameters: dict[str, Any], critical: float | None
) -> _Equation | None:
    """For tables without limits: the VDI's own melting point and boiling point at 1 atm."""
    row = handbook_row("vdi vapour pressure", cas)
    if row is None:
        return None
    equation = _vdi_vapour_pressure(cas, row)
    assert equation is not None
    pressure = FORMS[equation.form].scalar(equation.parameters)
    low, high = equation.low, 0.999 * equation.high
    if not pressure(low) < _ATMOSPHERE < pressure(high):
        return None
    for _ in range(60):
        middle = 0.5 * (low + high)
        low, high = (middle, high) if pressure(middle) < _ATMOSPHERE else (low, middle)
    caution = (
        "the table states no limits: taken from the melting point to the boiling point at "
        "1 atm, both from the same handbook"
    )
    # To a tenth of a kelvin, inwards: the last digits would claim too much.
    boiling = int(10.0 * low) / 10.0
    return _Equation(form, parameters, equation.low, boiling, critical, (caution,))


_PERRY: Final = "PerryGreen2008"
_VDI: Final = "VDIHeatAtlas2010"
METHODS: Final[tuple[HandbookMethod, ...]] = (
    HandbookMethod(
        "density", "DIPPR_PERRY_8E", "perry density", _perry_density, 0.003, _PERRY, "table 2-32"
    ),
    HandbookMethod(
        "density", "VDI_PPDS", "vdi density", _vdi_density, 0.003, _VDI, "section D3, density"
    ),
    HandbookMethod(
        "viscosity", "DIPPR_PERRY_8E", "perry viscosity", _dippr101, 0.05, _PERRY, "table 2-313"
    ),
    HandbookMethod(
        "viscosity",
        "VDI_PPDS",
        "vdi viscosity",
        _vdi_viscosity,
        0.05,
        _VDI,
        "section D3, dynamic viscosity of saturated liquids",
    ),
    HandbookMethod(
        "surface_tension",
        "REFPROP",
        "mulero surface tension",
        _mulero,
        0.015,
        "Mulero2012",
        "recommended correlations, with their continuation of 2014",
    ),
    HandbookMethod(
        "surface_tension",
        "JASPER",
        "jasper surface tension",
        _jasper,
        0.015,
        "Jasper1972",
        "straight lines as reprinted in Lange's Handbook",
    ),
    HandbookMethod(
        "surface_tension",
        "VDI_PPDS",
        "vdi surface tension",
        _vdi_surface_tension,
        0.02,
        _VDI,
        "section D3, surface tension",
    ),
    HandbookMethod(
        "vapour_pressure",
        "WAGNER_MCGARRY",
        "mcgarry vapour pressure",
        _mcgarry,
        0.015,
        "McGarry1983",
        "Wagner constants",
    ),
    HandbookMethod(
        "vapour_pressure",
        "DIPPR_PERRY_8E",
        "perry vapour pressure",
        _dippr101,
        0.02,
        _PERRY,
        "table 2-8",
    ),
    HandbookMethod(
        "vapour_pressure",
        "VDI_PPDS",
        "vdi vapour pressure",
        _vdi_vapour_pressure,
        0.02,
        _VDI,
        "section D3, vapour pressure",
    ),
    HandbookMethod(
        "heat_of_vaporisation",
        "DIPPR_PERRY_8E",
        "perry heat of vaporisation",
        _perry_heat_of_vaporisation,
        0.02,
        _PERRY,
        "table 2-150",
    ),
    HandbookMethod(
        "heat_of_vaporisation",
        "VDI_PPDS",
        "vdi heat of vaporisation",
        _vdi_heat_of_vaporisation,
        0.02,
        _VDI,
        "section D3, enthalpy of vaporization",
    ),
    HandbookMethod(
        "heat_capacity",
        "DIPPR_PERRY_8E",
        "perry heat capacity",
        _perry_heat_capacity,
        0.02,
        _PERRY,
        "table 2-153",
    ),
    HandbookMethod(
        "thermal_conductivity",
        "DIPPR_PERRY_8E",
        "perry thermal conductivity",
        _perry_conductivity,
        0.03,
        _PERRY,
        "table 2-315",
    ),
    HandbookMethod(
        "thermal_conductivity",
        "VDI_PPDS",
        "vdi thermal conductivity",
        _vdi_conductivity,
        0.03,
        _VDI,
        "section D3, thermal conductivity of saturated liquids",
    ),
    HandbookMethod(
        "static_permittivity",
        "CRC",
        "crc static permittivity",
        _crc_permittivity,
        0.02,
        "CRCHandbook2014",
        "Permittivity of Liquids",
    ),
)


def handbook_curve(cas: str, method: HandbookMethod) -> EngineCurve | None:
    """What one whitelisted method gives for a chemical, or None.

    Parameters
    ----------
    cas : str
        CAS registry number, already checked.
    method : HandbookMethod
        One of `METHODS`.

    Returns
    -------
    EngineCurve or None
        None where its table lacks the chemical, or states no limits for it.

    Raises
    ------
    EngineError
        If the table cannot be read.

    Examples
    --------
    >>> curve = handbook_curve("67-66-3", METHODS[2])
    >>> curve.property, curve.method
    ('viscosity', 'DIPPR_PERRY_8E')
    """
    row = handbook_row(method.table, cas)
    if row is None:
        return None
    try:
        equation = method.read(cas, row)
    except ValueError as error:
        raise EngineError(
            f"thermo {handbook_versions()}: the row of {cas} in its table of {method.place} "
            f"is unreadable ({error})"
        ) from None
    if equation is None:
        return None
    limits = inside_liquid(equation.low, equation.high, equation.critical_temperature)
    if limits is None:
        return None
    form = PPDS9 if equation.form == "ppds9" else FORMS[equation.form]
    bodies = (form.scalar(equation.parameters), form.array(equation.parameters))
    return EngineCurve(
        cas=cas,
        name=next(row[c] for c in ("Chemical", "Name", "Fluid") if c in row).strip(),
        property=method.property,
        engine="thermo",
        version=handbook_versions(),
        method=method.method,
        form=equation.form,
        place=method.place,
        range=limits,
        uncertainty=method.uncertainty,
        grade="single",
        sources=(method.source,),
        cautions=equation.cautions,
        bodies=bodies,
    )
