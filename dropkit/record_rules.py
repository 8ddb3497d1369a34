"""What a data record must earn beyond its format: sources that exist, and its grade.

The sealing command refuses a record that breaks one of these rules.
"""

from __future__ import annotations

import os
from collections.abc import Iterable, Iterator
from typing import Final

from dropkit.errors import nearest
from dropkit.record_store import Store, parse_file
from dropkit.record_types import (
    INTERFACIAL,
    LEADING,
    LiquidRecord,
    PairRecord,
    PropertyRecord,
    ThickenerRecord,
)

__all__ = ["ARCHIVE", "independent", "problems", "publication", "second_sources", "source_keys"]

# Its rows carry the DOI of the paper, each an independent source.
ARCHIVE: Final = "ThermoMLArchive"
LEAST_RECALLED: Final = 0.05
MEMORY: Final = "from memory"
NEVER_ESTIMATED: Final = (*LEADING, INTERFACIAL)


def publication(key: str) -> str:
    """The publication of a source key: its part before the first underscore.

    One publication may be entered in several parts, such as ``Key_alcohols``; they are one
    source when sources are counted.

    Examples
    --------
    >>> publication("Jasper1972_alcohols")
    'Jasper1972'
    """
    return key.partition("_")[0]


def independent(store: Store, keys: Iterable[str]) -> list[set[str]]:
    """Source keys in groups that can count as independent of one another.

    Parameters
    ----------
    store : Store
        The data folder.
    keys : iterable of str
        Source keys.

    Returns
    -------
    list of set of str
        Publications; parts of one, files with one DOI, and copies (``based_on``) are together.
    """
    groups: list[tuple[set[str], set[str]]] = []
    for key in dict.fromkeys(keys):
        held = key in store.stems("sources")
        data = parse_file(store.root, f"sources/{key}.toml") if held else {}
        marks = {publication(key), *map(publication, data.get("based_on", []))}
        if data.get("doi"):
            marks.add(str(data["doi"]).casefold())
        members = {key}
        for other in [group for group in groups if group[0] & marks]:
            groups.remove(other)
            marks |= other[0]
            members |= other[1]
        groups.append((marks, members))
    return [members for _, members in groups]


def source_keys(record: LiquidRecord | PairRecord | ThickenerRecord) -> Iterator[tuple[str, str]]:
    """Where each source key of a record stands, and the key."""
    if isinstance(record, LiquidRecord):
        for name, fact in record.facts.items():
            yield name, fact["source"]
    for blocks in record.properties.values():
        for block in blocks:
            for key in block.sources:
                yield block.label, key
            if block.second is not None:
                for key in second_sources(block):
                    yield f"{block.label}: second", key
            for check in block.checks:
                yield f"{block.label}: check at {check['T']:g} K", check["source"]


def second_sources(block: PropertyRecord) -> tuple[str, ...]:
    """Keys of the sources of a record's independent check."""
    if block.second is None:
        return ()
    return tuple(dict.fromkeys((block.second["source"], *block.second.get("sources", ()))))


def _grade_problems(store: Store, block: PropertyRecord) -> Iterator[str]:
    own, second = list(block.sources), list(second_sources(block))
    if block.grade == "own":
        yield "grade 'own' is for results, not for data files"
    if block.grade == "estimated" and block.property in NEVER_ESTIMATED:
        yield f"{block.property} is never estimated in a data file: leave it out"
    if block.grade == "measured":
        if not second:
            yield "grade 'measured' needs an independent check: second = { ... }"
        archive = any(publication(key) == ARCHIVE for key in (*own, *second))
        if len(independent(store, [*own, *second])) < 2 and not archive:
            yield "grade 'measured' needs two independent sources"
    if block.grade == "reference":
        others = [*second, *(check["source"] for check in block.checks)]
        if not any(group.isdisjoint(own) for group in independent(store, [*own, *others])):
            yield (
                "grade 'reference' needs one independent check: second, or a check point, of "
                "a source that is independent of sources"
            )
    if block.grade in ("recalled", "estimated"):
        if block.uncertainty < LEAST_RECALLED:
            yield (
                f"grade '{block.grade}' needs an uncertainty of at least {LEAST_RECALLED}, "
                f"not {block.uncertainty:g}"
            )
    else:
        for key in own:
            if key in store.stems("sources") and store.source(key).seen.startswith(MEMORY):
                yield f"grade '{block.grade}' rests on {key}, which is from memory"


def _is_solute(store: Store, key: str) -> bool:
    return bool(parse_file(store.root, f"liquids/{key}.toml").get("kind") == "solute")


def _boiled_away(record: LiquidRecord) -> Iterator[str]:
    """A liquid known only above its boiling point must say that pressure keeps it liquid."""
    boils = record.boiling_point
    lows = [b.range.low for name in LEADING for b in record.properties.get(name, ())]
    if boils is None or not lows or min(lows) <= boils:
        return
    if not any("pressure" in caution for caution in record.cautions):
        yield (
            f"cautions: nothing is known of the liquid below its boiling point ({boils:g} K), so "
            "a caution must say that it stays liquid under its own vapour pressure only"
        )


def problems(store: Store, record: LiquidRecord | PairRecord | ThickenerRecord) -> list[str]:
    """What is wrong with a record beyond the format of its file.

    Parameters
    ----------
    store : Store
        The data folder.
    record : LiquidRecord, PairRecord or ThickenerRecord
        The record.

    Returns
    -------
    list of str
        Unknown sources, missing published files, missing components, undeserved grades.
    """
    found = []
    sources = store.stems("sources")
    for where, key in source_keys(record):
        if key not in sources:
            near = nearest(key, sources, 1)
            guess = f"; did you mean '{near[0]}'?" if near else ""
            found.append(f"{where}: there is no data/sources/{key}.toml{guess}")
    if isinstance(record, PairRecord):
        for key in record.components:
            if key not in store.stems("liquids"):
                found.append(f"components: there is no data/liquids/{key}.toml")
            elif INTERFACIAL in record.properties and _is_solute(store, key):
                found.append(f"components: {key} is a solute, so it has no interface")
    if isinstance(record, LiquidRecord):
        found.extend(_boiled_away(record))
    for blocks in record.properties.values():
        for block in blocks:
            found.extend(f"{block.label}: {text}" for text in _grade_problems(store, block))
            for name in block.points:
                if not os.path.isfile(os.path.join(store.root, "published", f"{name}.csv")):
                    found.append(f"{block.label}: there is no data/published/{name}.csv")
    return list(dict.fromkeys(found))
