"""Chemicals that dropkit has no record of, by CAS number, and what its records lack, from the engines.

Names mean dropkit's own records and nothing else; a CAS number that no record holds is asked of
CoolProp and of the handbook tables of thermo (`dropkit.properties.engines`). The engines are
imported only then.
"""

from __future__ import annotations

from dataclasses import replace
from typing import Any, Final

from dropkit import records
from dropkit.errors import MissingProperty, UnknownName
from dropkit.properties.catalogue import resolve
from dropkit.properties.property_words import PROPERTIES
from dropkit.record_index import CAS_NUMBER
from dropkit.records import LiquidRecord, Table

__all__ = [
    "FROM_ENGINES",
    "awake",
    "from_engines",
    "key_of",
    "missing_from_engines",
    "with_engines",
]

# What an engine may give, in the order of tables; the others stand in records only.
FROM_ENGINES: Final = (
    "density",
    "viscosity",
    "surface_tension",
    "vapour_pressure",
    "heat_of_vaporisation",
    "heat_capacity",
    "thermal_conductivity",
    "static_permittivity",
    "speed_of_sound",
)
_HINT: Final = (
    "Any other chemical can be asked by its CAS number, such as liquid('108-86-1'), which takes "
    "seconds the first time"
)
_MADE: dict[str, LiquidRecord] = {}


def key_of(name: Any) -> str:
    """The key of what a name, or the CAS number of any chemical, means.

    Holds for the names that `dropkit.properties.catalogue.resolve` reads, and for CAS numbers of
    chemicals that CoolProp knows or that stand in the handbook tables of thermo.

    Parameters
    ----------
    name : str
        Such as ``"IPA"`` or ``"108-86-1"``.

    Returns
    -------
    str
        For `dropkit.records.liquid_record`: the key of a record, else the CAS number.

    Raises
    ------
    UnknownName
        No record has that name; neither records nor engines have data of that CAS number.
    AmbiguousName
        The name stands for several liquids.
    BadInput
        It is no text, or a CAS number whose last digit does not check.
    EngineError
        An engine is missing or unreadable.

    Notes
    -----
    Engines never see a name, because theirs slip: "xylene" gives o-xylene there.

    Examples
    --------
    >>> key_of("Glycerine"), key_of("108-86-1")
    ('glycerol', '108-86-1')
    """
    try:
        return resolve(name)
    except UnknownName as problem:
        cas = records.fold(name)
        if CAS_NUMBER.fullmatch(cas):
            return _adopted(cas)
        hint = f"{_HINT}; {problem.hint}" if problem.hint else _HINT
        raise UnknownName(
            problem.what, allowed=problem.allowed, choices=problem.choices, hint=hint
        ) from None


def awake(key: str) -> str:
    """The key of a component that was pickled, once its record can be found here.

    Parameters
    ----------
    key : str
        A key that `key_of` gave, perhaps in another process.

    Examples
    --------
    >>> awake("water")
    'water'
    """
    return key_of(key) if CAS_NUMBER.fullmatch(key) else key


def _adopted(cas: str) -> str:
    made = _MADE.get(cas)
    if made is None:
        # Imported here: only a CAS number that no record holds needs the engines.
        from dropkit.properties.engines import check_cas, engine_liquid, why_nothing

        check_cas(cas)
        with records.LOCK:
            made = _MADE.get(cas) or engine_liquid(cas)
            if made is None:
                raise UnknownName(
                    f"No liquid of CAS number {cas}: {why_nothing(cas)}",
                    allowed="a name or CAS number listed by dropkit.liquids(), or a CAS number "
                    "that an engine has data of",
                    hint="dropkit.fluid() makes a liquid of your own from a few numbers",
                )
            _MADE[cas] = made
    records.adopt(made)
    return cas


def from_engines(record: LiquidRecord) -> bool:
    """Whether a record as a whole was made by the engines, for want of one of dropkit's own.

    Parameters
    ----------
    record : LiquidRecord
        Of a liquid.
    """
    return record.key == record.cas


def with_engines(record: LiquidRecord) -> LiquidRecord:
    """A record with the properties that it lacks as the engines give them.

    Parameters
    ----------
    record : LiquidRecord
        One of dropkit's own.

    Returns
    -------
    LiquidRecord
        What it holds is neither replaced nor extended.

    Raises
    ------
    EngineError
        An engine is missing or unreadable.

    Examples
    --------
    >>> more = with_engines(records.liquid_record("ethanol"))
    >>> set(more.properties) >= set(records.liquid_record("ethanol").properties)
    True
    """
    if not record.cas or from_engines(record):
        return record
    # Imported here: only who asks for the engines needs them.
    from dropkit.properties.engines import engine_blocks, engine_properties

    lacking = tuple(p for p in engine_properties(record.cas) if p not in record.properties)
    added = {**record.properties, **engine_blocks(record.cas, lacking)}
    ordered = {prop: added[prop] for prop in PROPERTIES if prop in added}
    return replace(record, properties=Table(ordered))


def missing_from_engines(record: LiquidRecord, prop: str) -> MissingProperty:
    """Why neither a record nor the engines have a property.

    Parameters
    ----------
    record : LiquidRecord
        Of a liquid whose engines were asked.
    prop : str
        The word of the interface.
    """
    from dropkit.properties.engines import why_not

    if prop == "kinematic_viscosity":
        prop = next(part for part in ("viscosity", "density") if part not in record.properties)
    return why_not(record.cas, record.name, prop)
