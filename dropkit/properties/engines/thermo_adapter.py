"""thermo's named handbook methods, and none of its estimates.

thermo picks a method by itself, falls back to estimates that miss by a factor of fifty, and
extrapolates without a word. Here every method is named, rests on data that a handbook reduced, and
ends where its source ends. The coefficients are those that thermo uses; dropkit's own equation
forms evaluate them, so that arrays cost what numpy costs.
"""

from __future__ import annotations

from collections.abc import Callable, Mapping
from typing import Final, NamedTuple

from dropkit.errors import EngineError
from dropkit.properties.engines import handbook_rows as rows
from dropkit.properties.engines.engine_types import EngineCurve, inside_liquid
from dropkit.properties.engines.handbook_rows import HandbookEquation, equation_form
from dropkit.properties.engines.handbook_tables import handbook_row, handbook_versions

__all__ = ["METHODS", "REFUSED", "HandbookMethod", "handbook_curve"]

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
    "HEOS": "CoolProp is not asked for it; its surface tension stands as REFPROP, with limits",
    "COOLPROP": "asked directly, as method 'HEOS'",
    "VDI_TABULAR": "interpolates and extrapolates a coarse table",
    "Fit 2023": "a fit of thermo's own whose measurements are not named",
}


class HandbookMethod(NamedTuple):
    """A whitelisted method of thermo for one property.

    Parameters
    ----------
    quantity : str
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

    quantity: str
    method: str
    table: str
    read: Callable[[str, Mapping[str, str]], HandbookEquation | None]
    uncertainty: float
    source: str
    place: str


_PERRY: Final = "PerryGreen2008"
_VDI: Final = "VDIHeatAtlas2010"
# In order of preference within a property.
METHODS: Final[tuple[HandbookMethod, ...]] = (
    HandbookMethod(
        "density", "VDI_PPDS", "vdi density", rows.vdi_density, 0.002, _VDI, "section D3, density"
    ),
    HandbookMethod(
        "density",
        "DIPPR_PERRY_8E",
        "perry density",
        rows.perry_density,
        0.003,
        _PERRY,
        "table 2-32",
    ),
    HandbookMethod(
        "viscosity",
        "DIPPR_PERRY_8E",
        "perry viscosity",
        rows.perry_logarithmic,
        0.035,
        _PERRY,
        "table 2-313",
    ),
    HandbookMethod(
        "viscosity",
        "VDI_PPDS",
        "vdi viscosity",
        rows.vdi_viscosity,
        0.035,
        _VDI,
        "section D3, dynamic viscosity of saturated liquids",
    ),
    HandbookMethod(
        "surface_tension",
        "REFPROP",
        "mulero surface tension",
        rows.mulero_tension,
        0.015,
        "Mulero2012",
        "recommended correlations, with their continuation of 2014",
    ),
    HandbookMethod(
        "surface_tension",
        "JASPER",
        "jasper surface tension",
        rows.jasper_tension,
        0.015,
        "Jasper1972",
        "straight lines as reprinted in Lange's Handbook",
    ),
    HandbookMethod(
        "surface_tension",
        "VDI_PPDS",
        "vdi surface tension",
        rows.vdi_tension,
        0.02,
        _VDI,
        "section D3, surface tension",
    ),
    HandbookMethod(
        "vapour_pressure",
        "VDI_PPDS",
        "vdi vapour pressure",
        rows.vdi_pressure,
        0.01,
        _VDI,
        "section D3, vapour pressure",
    ),
    HandbookMethod(
        "vapour_pressure",
        "DIPPR_PERRY_8E",
        "perry vapour pressure",
        rows.perry_logarithmic,
        0.015,
        _PERRY,
        "table 2-8",
    ),
    HandbookMethod(
        "vapour_pressure",
        "WAGNER_MCGARRY",
        "mcgarry vapour pressure",
        rows.mcgarry_pressure,
        0.015,
        "McGarry1983",
        "Wagner constants",
    ),
    HandbookMethod(
        "heat_of_vaporisation",
        "VDI_PPDS",
        "vdi heat of vaporisation",
        rows.vdi_heat_of_vaporisation,
        0.01,
        _VDI,
        "section D3, enthalpy of vaporization",
    ),
    HandbookMethod(
        "heat_of_vaporisation",
        "DIPPR_PERRY_8E",
        "perry heat of vaporisation",
        rows.perry_heat_of_vaporisation,
        0.03,
        _PERRY,
        "table 2-150",
    ),
    HandbookMethod(
        "heat_capacity",
        "DIPPR_PERRY_8E",
        "perry heat capacity",
        rows.perry_heat_capacity,
        0.04,
        _PERRY,
        "table 2-153",
    ),
    HandbookMethod(
        "thermal_conductivity",
        "DIPPR_PERRY_8E",
        "perry thermal conductivity",
        rows.perry_conductivity,
        0.05,
        _PERRY,
        "table 2-315",
    ),
    HandbookMethod(
        "thermal_conductivity",
        "VDI_PPDS",
        "vdi thermal conductivity",
        rows.vdi_conductivity,
        0.05,
        _VDI,
        "section D3, thermal conductivity of saturated liquids",
    ),
    HandbookMethod(
        "static_permittivity",
        "CRC",
        "crc static permittivity",
        rows.crc_permittivity,
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
    >>> curve.quantity, curve.method
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
    form = equation_form(equation.form)
    bodies = (form.scalar(equation.parameters), form.array(equation.parameters))
    return EngineCurve(
        cas=cas,
        name=next(row[c] for c in ("Chemical", "Name", "Fluid") if c in row).strip(),
        quantity=method.quantity,
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
