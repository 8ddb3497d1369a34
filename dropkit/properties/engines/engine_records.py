"""What the engines give of one chemical, in the shape of dropkit's own records.

So the layers above need not know where a property comes from: a liquid, a mixture or a table that
can read a record can read these, and each says engine, version and method in its trail.
"""

from __future__ import annotations

import math
import re
from collections.abc import Callable
from typing import Final, TypeAlias

from dropkit.errors import DropkitError, EngineError, MissingProperty, OutOfRange
from dropkit.properties.curves import FloatArray
from dropkit.properties.engines.coolprop_adapter import coolprop_fluid
from dropkit.properties.engines.engine_choice import (
    chosen_curve,
    engine_boiling_point,
    engine_properties,
)
from dropkit.properties.engines.engine_types import EngineCurve
from dropkit.properties.engines.handbook_tables import handbook_row, identity_of, molar_mass_of
from dropkit.properties.engines.known_faults import EXCLUDED
from dropkit.records import LiquidRecord, PropertyRecord, Table

__all__ = ["engine_blocks", "engine_bodies", "engine_liquid", "why_nothing", "why_not"]

_Bodies: TypeAlias = tuple[Callable[[float], float], Callable[[FloatArray, FloatArray], None]]

# Shown with every chemical that dropkit has no record of.
_CAUTION: Final = (
    "no record of dropkit's own: values as CoolProp and handbook tables have them, each from one "
    "source; flash point and hazards are not known here: follow the safety data sheet"
)
_ELEMENT: Final = re.compile(r"[A-Z][a-z]?")
_HALOGENS: Final = {"F", "Cl", "Br", "I"}


def engine_liquid(cas: str) -> LiquidRecord | None:
    """All that the engines give of one chemical, or None where that is nothing.

    Parameters
    ----------
    cas : str
        CAS registry number.

    Returns
    -------
    LiquidRecord or None
        Its key is the CAS number. Each property rests on one method, as `engine_curve` chooses
        it; what is estimated only or known to be wrong is left out.

    Raises
    ------
    BadInput
        If `cas` is no CAS number.
    EngineError
        If an engine is missing or unreadable.

    Examples
    --------
    >>> record = engine_liquid("108-86-1")
    >>> record.name, record.formula, record.properties["viscosity"][0].grade
    ('bromobenzene', 'C6H5Br', 'single')
    """
    blocks = engine_blocks(cas, engine_properties(cas))
    if not blocks:
        return None
    fluid = coolprop_fluid(cas)
    identity = identity_of(cas)
    mass = molar_mass_of(cas)
    if mass is None:
        mass = identity.molar_mass if identity else fluid.molar_mass if fluid else math.nan
    formula = identity.formula if identity else fluid.formula if fluid else ""
    curve = chosen_curve(cas, next(iter(blocks)))
    handbook = handbook_row("vdi vapour pressure", cas)
    melting = fluid.melting_point if fluid else None
    critical = fluid.critical_temperature if fluid else None
    if handbook is not None:
        melting = float(handbook["Tm"])
        critical = float(handbook["Tc"]) if critical is None else critical
    family = _family(formula)
    return LiquidRecord(
        key=cas,
        name=identity.name if identity else curve.name,
        cas=cas,
        formula=formula,
        family=family,
        kind="liquid",
        # Whether it gathers at the surface of water is not known, so it counts as one that does.
        amphiphile=family == "other",
        synonyms=(),
        molar_mass=mass,
        melting_point=melting,
        boiling_point=engine_boiling_point(cas),
        critical_temperature=critical,
        facts=Table({}),
        cautions=(_CAUTION,),
        properties=Table(blocks),
    )


def engine_blocks(cas: str, properties: tuple[str, ...]) -> dict[str, tuple[PropertyRecord, ...]]:
    """Properties of a chemical as records, each of the method that `engine_curve` chooses.

    Parameters
    ----------
    cas : str
        CAS registry number.
    properties : tuple of str
        Of those that `engine_properties` names.

    Returns
    -------
    dict
        Property to its one record.

    Raises
    ------
    BadInput, MissingProperty, EngineError
        As `engine_curve` does.
    """
    return {prop: (_block(chosen_curve(cas, prop)),) for prop in properties}


def engine_bodies(record: PropertyRecord) -> _Bodies:
    """The evaluators behind a record that `engine_blocks` made.

    Parameters
    ----------
    record : PropertyRecord
        Its parameters name engine, method and chemical.

    Returns
    -------
    tuple of callable
        For a float, and for an array into another; both give NaN outside the stated range,
        whatever range policy asks: engines are not extrapolated.

    Raises
    ------
    EngineError, MissingProperty
        If the engines here no longer give it.
    """
    curve = chosen_curve(record.parameters["cas"], record.property, record.parameters["method"])
    return _nan_outside(curve), curve.fill


def why_not(cas: str, name: str, prop: str) -> MissingProperty:
    """Why the engines give no such property of a chemical, in their words.

    Parameters
    ----------
    cas, name, prop : str
        CAS registry number, what the chemical is called, the word of the interface.
    """
    try:
        chosen_curve(cas, prop)
    except EngineError as problem:
        return MissingProperty(
            f"{name} has no {prop} that can be trusted. {problem.what}",
            hint=f"If you have measured it, add it: with_values({prop}=...)",
        )
    except DropkitError as problem:
        return MissingProperty(
            f"{name} has no {prop}. {problem.what}",
            allowed=problem.allowed and f"it has {problem.allowed}",
            hint=f"If you have measured it, add it: with_values({prop}=...)",
        )
    return MissingProperty(f"{name} has no {prop}")


def why_nothing(cas: str) -> str:
    """Why the engines give nothing at all of a chemical.

    Parameters
    ----------
    cas : str
        CAS registry number, already checked.
    """
    faults = {entry.property: entry.reason for entry in EXCLUDED if entry.cas == cas}
    identity = identity_of(cas)
    who = f"{cas} ({identity.name})" if identity else cas
    if faults:
        left = "; ".join(f"{prop}: {reason}" for prop, reason in faults.items())
        return f"CoolProp and thermo have nothing of {who} that can be trusted. Left out: {left}"
    if identity:
        return (
            f"CoolProp and the handbook tables of thermo have no data on {who} within stated "
            "limits; thermo's estimates are not used"
        )
    return f"neither dropkit's records nor CoolProp nor thermo know {cas}"


def _block(curve: EngineCurve) -> PropertyRecord:
    use = curve.record_use()
    return PropertyRecord(
        property=curve.quantity,
        label=curve.label,
        form=curve.form,
        parameters=Table(
            {
                "engine": curve.engine,
                "version": curve.version,
                "method": curve.method,
                "cas": curve.cas,
            }
        ),
        range=curve.range,
        mixture_range=None,
        uncertainty=curve.uncertainty,
        uncertainty_absolute=None,
        grade=curve.grade,
        sources=use.sources,
        place=use.place,
        obtained=f"method {curve.method} of {curve.engine} {curve.version}",
        second=None,
        left_out=None,
        checks=(),
        cautions=curve.cautions,
        points=(),
    )


def _nan_outside(curve: EngineCurve) -> Callable[[float], float]:
    def scalar(temperature: float) -> float:
        try:
            return curve.scalar(temperature)
        except (OutOfRange, EngineError):
            return math.nan

    return scalar


def _family(formula: str) -> str:
    """As much of the chemical family as a formula tells; it decides what may be mixed."""
    elements = set(_ELEMENT.findall(formula))
    if "C" not in elements:
        return "inorganic"
    if elements <= {"C", "H"}:
        return "hydrocarbon"
    return "halogenated" if elements <= {"C", "H", *_HALOGENS} else "other"
