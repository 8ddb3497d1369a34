"""Rows of handbook tables read as equations: form, parameters in SI, and the stated limits."""

from __future__ import annotations

import math
from collections.abc import Callable, Mapping
from typing import Any, Final, NamedTuple

from dropkit.properties.engines.handbook_forms import PPDS9
from dropkit.properties.engines.handbook_tables import handbook_row, molar_mass_of
from dropkit.properties.equations import FORMS, Form

__all__ = [
    "HandbookEquation",
    "crc_permittivity",
    "equation_form",
    "jasper_tension",
    "mcgarry_pressure",
    "mulero_tension",
    "perry_conductivity",
    "perry_density",
    "perry_heat_capacity",
    "perry_heat_of_vaporisation",
    "perry_logarithmic",
    "vdi_conductivity",
    "vdi_density",
    "vdi_heat_of_vaporisation",
    "vdi_pressure",
    "vdi_tension",
    "vdi_viscosity",
]

_GAS_CONSTANT: Final = 8.31446261815324  # J/(mol K), exact in the SI
_ATMOSPHERE: Final = 101325.0  # Pa


class HandbookEquation(NamedTuple):
    """A row turned into an equation.

    Parameters
    ----------
    form : str
        Name of the equation form, for `equation_form`.
    parameters : dict
        Its parameters, such that it takes K and gives SI.
    low, high : float
        The limits that the source states, or those taken in their place [K].
    critical_temperature : float or None
        Where the row has it [K].
    cautions : tuple of str
        What to know of the limits.
    """

    form: str
    parameters: dict[str, Any]
    low: float
    high: float
    critical_temperature: float | None = None
    cautions: tuple[str, ...] = ()


def _numbers(row: Mapping[str, str], *columns: str) -> list[float]:
    return [float(row[column] or 0.0) for column in columns]


def _stated(row: Mapping[str, str]) -> tuple[float, float] | None:
    """The limits of a row, where it has both."""
    low, high = row["Tmin"], row["Tmax"]
    return (float(low), float(high)) if low and high else None


# ------------------------------------------------ density
def perry_density(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """Rackett's equation (DIPPR 105) in mol/m3, by the molar mass."""
    limits, mass = _stated(row), molar_mass_of(cas)
    if limits is None or mass is None:
        return None
    c = _numbers(row, "C1", "C2", "C3", "C4")
    return HandbookEquation("rackett", {"coefficients": c, "unit": mass}, *limits, c[2])


def vdi_density(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """Critical density and four powers of the distance to the critical point, in kg/m3."""
    critical, *c = _numbers(row, "Tc", "rhoc", "A", "B", "C", "D")
    powers = {
        "coefficients": c,
        "exponents": [0.0, 0.35, 2.0 / 3.0, 1.0, 4.0 / 3.0],
        "critical_temperature": critical,
    }
    return _between_melting_and_boiling(cas, "critical_powers", powers, critical, falls=True)


# ------------------------------------------------ viscosity
def perry_logarithmic(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """DIPPR 101, for viscosity [Pa*s] and vapour pressure [Pa]."""
    limits = _stated(row)
    c = _numbers(row, "C1", "C2", "C3", "C4", "C5")
    return None if limits is None else HandbookEquation("dippr101", {"coefficients": c}, *limits)


def vdi_viscosity(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """PPDS 9 in Pa*s; the table states no limits."""
    c = _numbers(row, "A", "B", "C", "D", "E")
    return _between_melting_and_boiling(cas, "ppds9", {"coefficients": c}, None, falls=True)


# ------------------------------------------------ surface tension
def mulero_tension(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """Up to three powers of the distance to the critical point, in N/m."""
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
    return HandbookEquation("critical_powers", parameters, *limits, critical)


def jasper_tension(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """A straight line in degC, in mN/m; refused where its limits are missing or reach zero."""
    limits = _stated(row)
    at_zero, slope = _numbers(row, "a", "b")
    line = {"coefficients": [at_zero, -slope], "centre": 273.15, "unit": 1e-3}
    caution = (
        "the limits are those of the copy, mostly melting and boiling point; Jasper's measured "
        "temperatures are not carried"
    )
    if limits is None or at_zero - slope * (limits[1] - 273.15) <= 0.0:
        return None
    return HandbookEquation("polynomial", line, *limits, None, (caution,))


def vdi_tension(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """DIPPR 106 in N/m, from the melting point stated beside it."""
    melting, critical, *c = _numbers(row, "Tm", "Tc", "A", "B", "C", "D", "E")
    parameters = {"coefficients": c, "critical_temperature": critical}
    return HandbookEquation("watson", parameters, melting, critical, critical)


# ------------------------------------------------ vapour
def _wagner(row: Mapping[str, str], exponents: list[float]) -> dict[str, Any]:
    critical, pressure, *c = _numbers(row, "Tc", "Pc", "A", "B", "C", "D")
    return {
        "coefficients": c,
        "exponents": exponents,
        "critical_temperature": critical,
        "critical_pressure": pressure,
    }


def mcgarry_pressure(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """Wagner's equation with powers 1, 1.5, 3 and 6."""
    if not row["Tmin"]:
        return None
    low, critical = _numbers(row, "Tmin", "Tc")
    return HandbookEquation("wagner", _wagner(row, [1.0, 1.5, 3.0, 6.0]), low, critical, critical)


def vdi_pressure(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """Wagner's equation with powers 1, 1.5, 2.5 and 5, from the melting point beside it."""
    melting, critical = _numbers(row, "Tm", "Tc")
    return HandbookEquation(
        "wagner", _wagner(row, [1.0, 1.5, 2.5, 5.0]), melting, critical, critical
    )


def perry_heat_of_vaporisation(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """DIPPR 106 in J/mol, by the molar mass."""
    limits, mass = _stated(row), molar_mass_of(cas)
    if limits is None or mass is None:
        return None
    critical, *c = _numbers(row, "Tc", "C1", "C2", "C3", "C4")
    parameters = {"coefficients": c, "critical_temperature": critical, "unit": 1.0 / mass}
    return HandbookEquation("watson", parameters, *limits, critical)


def vdi_heat_of_vaporisation(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """PPDS 12: five powers of the distance to the critical point, times R Tc."""
    critical, mass, *c = _numbers(row, "Tc", "MW", "A", "B", "C", "D", "E")
    powers = {
        "coefficients": c,
        "exponents": [1.0 / 3.0, 2.0 / 3.0, 1.0, 2.0, 6.0],
        "critical_temperature": critical,
        "factor": _GAS_CONSTANT * critical,
        "unit": 1e3 / mass,
    }
    return _between_melting_and_boiling(cas, "critical_powers", powers, critical, falls=True)


# ------------------------------------------------ the rest
def perry_heat_capacity(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """A polynomial (DIPPR 100) in J/(kmol K), by the molar mass."""
    limits, mass = _stated(row), molar_mass_of(cas)
    if limits is None or mass is None:
        return None
    c = _numbers(row, "A", "B", "C", "D", "E")
    return HandbookEquation("polynomial", {"coefficients": c, "unit": 1e-3 / mass}, *limits)


def perry_conductivity(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """A polynomial (DIPPR 100) in W/(m K)."""
    limits = _stated(row)
    c = _numbers(row, "C1", "C2", "C3", "C4", "C5")
    return None if limits is None else HandbookEquation("polynomial", {"coefficients": c}, *limits)


def vdi_conductivity(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """A polynomial in W/(m K); the table states no limits."""
    c = _numbers(row, "A", "B", "C", "D", "E")
    return _between_melting_and_boiling(cas, "polynomial", {"coefficients": c}, None, falls=False)


def crc_permittivity(cas: str, row: Mapping[str, str]) -> HandbookEquation | None:
    """A polynomial; rows with one value at one temperature are left out."""
    limits = _stated(row)
    c = _numbers(row, "A", "B", "C", "D")
    return (
        None
        if limits is None or not c[0]
        else HandbookEquation("polynomial", {"coefficients": c}, *limits)
    )


def _between_melting_and_boiling(
    cas: str, form: str, parameters: dict[str, Any], critical: float | None, *, falls: bool
) -> HandbookEquation | None:
    """For tables without limits: the VDI's own melting point and boiling point at 1 atm."""
    row = handbook_row("vdi vapour pressure", cas)
    if row is None:
        return None
    equation = vdi_pressure(cas, row)
    assert equation is not None
    pressure = FORMS[equation.form].scalar(equation.parameters)
    low, high = equation.low, 0.999 * equation.high
    if not pressure(low) < _ATMOSPHERE < pressure(high):
        return None
    for _ in range(40):
        middle = 0.5 * (low + high)
        low, high = (middle, high) if pressure(middle) < _ATMOSPHERE else (low, middle)
    limits = _sound_part(equation_form(form).scalar(parameters), equation.low, low, falls)
    if limits is None:
        return None
    caution = (
        "the table states no limits: taken from the melting point to the boiling point at 1 atm, "
        "both from the same handbook"
    )
    if limits != (equation.low, low):
        caution += ", and cut where the equation turns"
    return HandbookEquation(form, parameters, *limits, critical, (caution,))


def _sound_part(
    value: Callable[[float], float], low: float, high: float, falls: bool
) -> tuple[float, float] | None:
    """The longest stretch where an equation is positive and, where it should, falls with T."""
    grid = [low + (high - low) * step / 64.0 for step in range(65)]
    best: tuple[int, int] = (0, 0)
    start, last = 0, math.inf
    for place, temperature in enumerate(grid):
        try:
            now = value(temperature)
        except (ArithmeticError, ValueError):
            now = math.nan
        if not (now > 0.0 and (not falls or now < last)):
            start = place if now > 0.0 else place + 1
        last = now if now > 0.0 else math.inf
        if place - start > best[1] - best[0]:
            best = (start, place)
    return (grid[best[0]], grid[best[1]]) if best[1] > best[0] else None


def equation_form(name: str) -> Form:
    """The equation form of a handbook table by its name: dropkit's own, or PPDS 9.

    Examples
    --------
    >>> equation_form("ppds9").name
    'ppds9'
    """
    return PPDS9 if name == "ppds9" else FORMS[name]
