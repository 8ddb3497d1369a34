"""What a data file may hold: reads the parsed TOML into frozen records, or says what is wrong.

``data/README.md`` describes the format for contributors; this file is its strict reading.
"""

from __future__ import annotations

import math
from collections.abc import Mapping
from typing import Any, Final, NoReturn, TypeGuard, cast

from dropkit.errors import RecordError, nearest
from dropkit.provenance import GRADES, Grade, Source
from dropkit.record_types import (
    INTERFACIAL,
    PROPERTIES,
    LiquidRecord,
    PairRecord,
    PropertyRecord,
    Table,
)
from dropkit.validity import Range

__all__ = ["read_interface", "read_liquid", "read_pair", "read_source"]

AS_PUBLISHED: Final = "as published"
KINDS_OF_RECORD: Final = ("liquid", "solute")

_CONSTANTS: Final = (
    "molar_mass",
    "melting_point",
    "boiling_point",
    "critical_temperature",
    "critical_pressure",
    "critical_density",
    "flash_point",
    "heat_of_fusion",
    "solid_density",
)
_LIQUID_KEYS: Final = (
    "name",
    "cas",
    "formula",
    "family",
    "kind",
    "amphiphile",
    "synonyms",
    "cautions",
    "seal",
    *_CONSTANTS,
    "hazards",
    *PROPERTIES,
)
# Keys of a block that are no parameter of its equation.
_BLOCK_KEYS: Final = (
    "form",
    "range",
    "mixture_range",
    "uncertainty",
    "uncertainty_absolute",
    "grade",
    "sources",
    "place",
    "obtained",
    "second",
    "left_out",
    "checks",
    "cautions",
    "points",
)


class _Reader:
    """Reads one table of one file; every error names the file, the key and the command."""

    def __init__(self, file: str, data: Mapping[str, Any], where: str = "") -> None:
        self.file, self.data, self.where = file, data, where

    def fail(
        self, key: str, what: str, allowed: str = "", near: list[str] | None = None
    ) -> NoReturn:
        place = f"{self.where}: {key}" if self.where else key
        command = f"python -m dropkit.records seal {self.file.removesuffix('.toml')}"
        raise RecordError(
            f"data/{self.file}: {place}: {what}",
            allowed=allowed or "the format in data/README.md",
            choices=near or (),
            hint=f"Mend the file, then run: {command}",
        )

    def text(self, key: str, default: str | None = None) -> str:
        value = self.data.get(key, default)
        if value is None:
            self.fail(key, "is missing", "a text")
        if not isinstance(value, str) or (default is None and not value.strip()):
            self.fail(key, f"is {value!r}", "a text that is not empty")
        return value

    def texts(self, key: str) -> tuple[str, ...]:
        value = self.data.get(key, [])
        if not isinstance(value, list) or not all(isinstance(v, str) and v for v in value):
            self.fail(key, f"is {value!r}", "a list of texts")
        return tuple(value)

    def number(self, key: str, *, lowest: float | None = None, required: bool = True) -> Any:
        value = self.data.get(key)
        if value is None and not required:
            return None
        if value is None:
            self.fail(key, "is missing", "a number")
        return self.a_number(key, value, lowest)

    def a_number(self, key: str, value: Any, lowest: float | None = None) -> float:
        if isinstance(value, bool) or not isinstance(value, (int, float)):
            self.fail(key, f"is {value!r}", "a number")
        if not math.isfinite(value) or (lowest is not None and not value > lowest):
            self.fail(key, f"is {value!r}", "a finite number" + _above(lowest))
        return float(value)

    def interval(self, key: str, what: str, unit: str, lowest: float = 0.0) -> Range:
        value = self.data.get(key)
        if not isinstance(value, list) or len(value) != 2:
            self.fail(key, f"is {value!r}", f"[lowest, highest] {what} {unit}".rstrip())
        low, high = (self.a_number(key, end) for end in value)
        if not lowest <= low < high:
            self.fail(key, f"runs from {low:g} to {high:g}", f"{what} rising from {lowest:g}")
        return Range(low, high, what, unit)

    def choice(self, key: str, words: tuple[str, ...], default: str | None = None) -> str:
        value = self.text(key, default)
        if value not in words:
            self.fail(key, f"is {value!r}", ", ".join(words), nearest(value, words, 1))
        return value

    def table(self, key: str) -> _Reader | None:
        value = self.data.get(key)
        if value is None:
            return None
        if not isinstance(value, Mapping):
            self.fail(key, f"is {value!r}", "a table")
        return _Reader(self.file, value, f"{self.where}: {key}" if self.where else key)

    def only(self, keys: tuple[str, ...]) -> None:
        for key in self.data:
            if key not in keys:
                self.fail(key, "is not known here", ", ".join(keys), nearest(key, keys, 1))


def _tables(value: Any) -> TypeGuard[list[Mapping[str, Any]]]:
    return (
        isinstance(value, list)
        and len(value) > 0
        and all(isinstance(entry, Mapping) for entry in value)
    )


def _above(lowest: float | None) -> str:
    return "" if lowest is None else f" above {lowest:g}"


def _blocks(reader: _Reader, subject: str, name: str, *, pair: bool) -> tuple[PropertyRecord, ...]:
    blocks = reader.data[name]
    if not _tables(blocks):
        reader.fail(name, "is not a list of blocks", f"[[{name}]] with double brackets")
    return tuple(
        _block(
            _Reader(reader.file, block, f"{name} {number}"),
            f"{subject}: {name} {number}",
            name,
            pair=pair,
        )
        for number, block in enumerate(blocks, 1)
    )


def _block(reader: _Reader, label: str, name: str, *, pair: bool) -> PropertyRecord:
    reasons = {
        key: reader.text(key)
        for key in reader.data
        if key in ("note", "reason") or key.endswith("_reason")
    }
    parameters = {
        key: value
        for key, value in reader.data.items()
        if key not in _BLOCK_KEYS and key not in reasons
    }
    stated = reader.interval("range", "temperature", "K")
    wider = None
    if "mixture_range" in reader.data:
        wider = reader.interval("mixture_range", "temperature", "K")
        if wider.low > stated.low or wider.high < stated.high:
            reader.fail("mixture_range", f"is {wider}", f"a range that holds {stated}")
    if pair:
        fractions = reader.interval("fraction_range", "mass fraction", "")
        if fractions.high > 1:
            reader.fail("fraction_range", f"ends at {fractions.high:g}", "0 to 1")
    checks = _checks(reader, wider or stated, pair=pair)
    absolute = reader.number("uncertainty_absolute", lowest=0.0, required=False)
    if absolute is None or "uncertainty" in reader.data:
        uncertainty = reader.number("uncertainty", lowest=0.0)
        # A factor of ten, as for electrical conductivities, is the most that makes sense.
        if uncertainty > 10:
            reader.fail("uncertainty", f"is {uncertainty:g}", "a fraction, not percent")
    else:
        uncertainty = absolute / abs(checks[0]["value"])
    home = reader.file.partition("/")[0]
    sources = reader.texts("sources")
    if not sources:
        reader.fail("sources", "is missing", "at least one source key: no source, no record")
    return PropertyRecord(
        property=name,
        label=label,
        form=reader.text("form"),
        parameters=Table(parameters),
        range=stated,
        mixture_range=wider,
        uncertainty=uncertainty,
        uncertainty_absolute=absolute,
        grade=cast(Grade, reader.choice("grade", GRADES)),
        sources=sources,
        place=reader.text("place"),
        obtained=reader.text("obtained") if "obtained" in reader.data else AS_PUBLISHED,
        second=_second(reader.table("second")),
        left_out=_left_out(reader.table("left_out")),
        checks=tuple(_with_tolerance(check, uncertainty, absolute) for check in checks),
        cautions=reader.texts("cautions"),
        points=tuple(n if "/" in n else f"{home}/{n}" for n in reader.texts("points")),
        reasons=Table(reasons),
    )


def _checks(reader: _Reader, limits: Range, *, pair: bool) -> tuple[Table, ...]:
    rows = reader.data.get("checks")
    if not _tables(rows):
        reader.fail("checks", "has no check point", "at least one { T, value, source, tolerance }")
    keys: tuple[str, ...] = ("T", "value", "source", "place", "tolerance")
    if pair:
        keys = (*keys, "fraction")
    for number, row in enumerate(rows, 1):
        check = _Reader(reader.file, row, f"{reader.where}: check {number}")
        check.only(keys)
        T = check.number("T", lowest=0.0)
        if not limits.holds(T):
            check.fail("T", f"is {T:g} K", f"inside the range, {limits}")
        check.number("value", lowest=0.0)
        check.number("tolerance", lowest=0.0, required=False)
        check.text("source")
        check.text("place", "")
        if pair:
            fraction = check.number("fraction")
            if not 0 <= fraction <= 1:
                check.fail("fraction", f"is {fraction:g}", "a mass fraction, 0 to 1")
    return tuple(map(Table, rows))


def _with_tolerance(check: Table, uncertainty: float, absolute: float | None) -> Table:
    """A check with what it may be off: by itself, the 95 % band of its record."""
    band = 2.0 * max(uncertainty, (absolute or 0.0) / check["value"])
    return Table({"tolerance": band, **check})


def _second(reader: _Reader | None) -> Table | None:
    if reader is None:
        return None
    reader.only(("source", "sources", "points", "median", "worst", "place", "note"))
    reader.text("source")
    reader.texts("sources")
    for key, lowest in (("points", 0.0), ("median", None), ("worst", None)):
        reader.number(key, lowest=lowest)
    return Table(reader.data)


def _left_out(reader: _Reader | None) -> Table | None:
    if reader is None:
        return None
    reader.only(("how", "median", "p95", "worst", "points", "note"))
    how = reader.text("how", "every fifth point")
    reader.number("median")
    for key in ("p95", "worst", "points"):
        reader.number(key, required=False)
    return Table({"how": how, **reader.data})


def read_liquid(key: str, data: Mapping[str, Any]) -> LiquidRecord:
    """Read the parsed file of a liquid.

    Parameters
    ----------
    key : str
        Name of the file without ``.toml``.
    data : mapping
        Its parsed content.

    Returns
    -------
    LiquidRecord
        The frozen record.

    Raises
    ------
    RecordError
        Naming file, key and what is wrong.
    """
    reader = _Reader(f"liquids/{key}.toml", data)
    reader.only(_LIQUID_KEYS)
    facts = {}
    for name in (*_CONSTANTS, "hazards"):
        fact = reader.table(name)
        if fact is None:
            continue
        fact.text("source")
        if name == "hazards":
            fact.texts("notes")
        else:
            fact.number("value", lowest=0.0)
        if name == "flash_point":
            fact.text("method")
        facts[name] = Table(fact.data)
    if "molar_mass" not in facts:
        reader.fail("molar_mass", "is missing", "a table with value [kg/mol] and source")
    values = {name: facts[name]["value"] for name in _CONSTANTS if name in facts}
    if values["molar_mass"] > 10:
        reader.fail("molar_mass", f"is {values['molar_mass']:g}", "kg/mol, not g/mol")
    amphiphile = data.get("amphiphile", False)
    if not isinstance(amphiphile, bool):
        reader.fail("amphiphile", f"is {amphiphile!r}", "true or false")
    subject = f"liquids/{key}"
    return LiquidRecord(
        key=key,
        name=reader.text("name"),
        cas=reader.text("cas", ""),
        formula=reader.text("formula", ""),
        family=reader.text("family"),
        kind=reader.choice("kind", KINDS_OF_RECORD, "liquid"),
        amphiphile=amphiphile,
        synonyms=reader.texts("synonyms"),
        molar_mass=values["molar_mass"],
        melting_point=values.get("melting_point"),
        boiling_point=values.get("boiling_point"),
        critical_temperature=values.get("critical_temperature"),
        facts=Table(facts),
        cautions=reader.texts("cautions"),
        properties=Table(
            {
                name: _blocks(reader, subject, name, pair=False)
                for name in PROPERTIES
                if name in data
            }
        ),
    )


def read_pair(stem: str, data: Mapping[str, Any]) -> PairRecord:
    """Read the parsed file of a pair.

    Parameters
    ----------
    stem : str
        Name of the file without ``.toml``: both keys, alphabetical, joined by ``__``.
    data : mapping
        Its parsed content.

    Returns
    -------
    PairRecord
        The frozen record.

    Raises
    ------
    RecordError
        Naming file, key and what is wrong.
    """
    reader = _Reader(f"mixtures/{stem}.toml", data)
    reader.only(("components", "seal", *PROPERTIES))
    components = _components(reader, stem)
    subject = f"mixtures/{stem}"
    return PairRecord(
        components=components,
        properties=Table(
            {name: _blocks(reader, subject, name, pair=True) for name in PROPERTIES if name in data}
        ),
    )


def _components(reader: _Reader, stem: str) -> tuple[str, str]:
    components = reader.texts("components")
    if len(components) != 2 or not components[0] < components[1]:
        reader.fail("components", f"is {list(components)}", "two keys in alphabetical order")
    if "__".join(components) != stem:
        reader.fail("components", f"are {components}", f"those of the file's name, {stem}")
    return components[0], components[1]


def read_interface(stem: str, data: Mapping[str, Any]) -> PairRecord:
    """Read the parsed file of two liquids in contact.

    Parameters
    ----------
    stem : str
        Name of the file without ``.toml``: both keys, alphabetical, joined by ``__``.
    data : mapping
        Its parsed content.

    Returns
    -------
    PairRecord
        The frozen record; its one property is the interfacial tension.

    Raises
    ------
    RecordError
        Naming file, key and what is wrong.
    """
    reader = _Reader(f"interfaces/{stem}.toml", data)
    reader.only(("components", "seal", INTERFACIAL))
    components = _components(reader, stem)
    if INTERFACIAL not in data:
        reader.fail(INTERFACIAL, "is missing", f"[[{INTERFACIAL}]] with double brackets")
    blocks = _blocks(reader, f"interfaces/{stem}", INTERFACIAL, pair=False)
    for number, block in enumerate(blocks, 1):
        if block.mixture_range is not None:
            reader.fail(f"{INTERFACIAL} {number}: mixture_range", "means nothing", "range alone")
    return PairRecord(components=components, properties=Table({INTERFACIAL: blocks}))


def read_source(key: str, data: Mapping[str, Any]) -> Source:
    """Read the parsed file of a source.

    Parameters
    ----------
    key : str
        Name of the file without ``.toml``.
    data : mapping
        Its parsed content.

    Returns
    -------
    Source
        The publication.

    Raises
    ------
    RecordError
        Naming file, key and what is wrong.
    """
    reader = _Reader(f"sources/{key}.toml", data)
    reader.only(("citation", "doi", "seen", "based_on", "note"))
    reader.texts("based_on")
    return Source(key, reader.text("citation"), reader.text("doi", ""), reader.text("seen"))
