"""Adds flash points and hazard notes of `safety.csv` to the specs of liquids that lack them.

    python data/build/add_safety_facts.py [--dry-run] [key ...]

A table that a spec already has stays as it is; where its flash point differs from the one of
`safety.csv`, or its notes don't name a code of it, that is said. The notes are written from the codes of the table: hazard statements
(H..., EUH...), groups of the IARC (IARC1, IARC2A, IARC2B), SKIN (skin notation of an exposure
limit), and PART (the sources seen give no full list). Build the records of the keys it prints.
"""

from __future__ import annotations

import csv
import json
import re
import sys
import tomllib
from collections.abc import Sequence
from pathlib import Path
from typing import Any, Final, NamedTuple

HERE: Final = Path(__file__).resolve().parent
TABLE: Final = HERE / "safety.csv"
SPECS: Final = HERE / "specs" / "liquids"
SOURCES: Final = HERE.parent / "sources"
FLASH_BELOW: Final = 333.15  # K: liquids that flash below it count as flammable
STANDING: Final = "Read the safety data sheet and follow local codes; these notes replace neither."
MIST: Final = "A mist or foam can burn below the flash point."
COMBUSTIBLE: Final = (
    "Combustible liquid; heated, or as a mist or foam, it burns also below its flash point."
)
PARTIAL: Final = "The sources seen give no full list of its hazards."
FLAMMABLE: Final = frozenset({"H224", "H225", "H226"})

# One note per group, in this order; the clauses are joined by semicolons.
GROUPS: Final[Sequence[dict[str, str]]] = (
    {
        "H224": "extremely flammable liquid and vapour (H224): an ignitable mixture forms above "
        "the liquid even in the cold",
        "H225": "highly flammable liquid and vapour (H225): an ignitable mixture forms above the "
        "liquid at room temperature",
        "H226": "flammable liquid and vapour (H226)",
    },
    {
        "H301": "toxic if swallowed (H301)",
        "H302": "harmful if swallowed (H302)",
        "H304": "may be fatal if swallowed and enters airways (H304)",
        "H311": "toxic in contact with skin (H311)",
        "H312": "harmful in contact with skin (H312)",
        "H331": "toxic if inhaled (H331)",
        "H332": "harmful if inhaled (H332)",
        "SKIN": "taken up through the skin (skin notation of an exposure limit)",
    },
    {
        "H314": "causes severe burns of skin and eyes (H314)",
        "H315": "causes skin irritation (H315)",
        "H317": "may cause an allergic skin reaction (H317)",
        "H318": "causes serious eye damage (H318)",
        "H319": "causes serious eye irritation (H319)",
        "H335": "may irritate the airways (H335)",
        "H336": "vapour may cause drowsiness or dizziness (H336)",
        "EUH066": "repeated exposure dries the skin (EUH066)",
    },
    {
        "H340": "may cause genetic defects (H340)",
        "H341": "suspected of causing genetic defects (H341)",
        "H350": "may cause cancer (H350)",
        "H351": "suspected of causing cancer (H351)",
        "IARC1": "carcinogenic to humans (IARC group 1)",
        "IARC2A": "probably carcinogenic to humans (IARC group 2A)",
        "IARC2B": "possibly carcinogenic to humans (IARC group 2B)",
        "H360": "may damage fertility or the unborn child (H360)",
        "H360D": "may damage the unborn child (H360D)",
        "H360F": "may damage fertility (H360F)",
        "H361d": "suspected of damaging the unborn child (H361d)",
        "H361f": "suspected of impairing fertility (H361f)",
        "H372": "damages organs by long or repeated exposure (H372)",
        "H373": "may damage organs by long or repeated exposure (H373)",
    },
    {
        "H410": "very toxic to aquatic life with long lasting effects (H410)",
        "H411": "toxic to aquatic life with long lasting effects (H411)",
        "H412": "harmful to aquatic life with long lasting effects (H412)",
        "H420": "harms the ozone layer of the upper atmosphere (H420)",
    },
)
CODES: Final = frozenset(code for group in GROUPS for code in group) | {"PART"}


class Flash(NamedTuple):
    value: float  # K
    method: str
    source: str
    place: str
    note: str


class Row(NamedTuple):
    key: str
    cas: str
    flash: Flash | None
    codes: tuple[str, ...]
    source: str
    place: str


class SafetyError(Exception):
    """A row of the table that can't be used."""


def _source(key: str, name: str) -> str:
    if not (SOURCES / f"{name}.toml").exists():
        raise SafetyError(f"{key}: source {name!r} has no file in data/sources")
    return name


def read_row(cells: dict[str, str]) -> Row:
    """One line of the table, checked: known codes, known sources, a flash point in kelvin."""
    key = cells["key"]
    flash = None
    if cells["flash_point_K"]:
        value = float(cells["flash_point_K"])
        if not 200.0 <= value <= 700.0:
            raise SafetyError(f"{key}: flash point {value:g}; in kelvin, 200 to 700")
        if not cells["method"]:
            raise SafetyError(f"{key}: its flash point names no method; 'not stated' is one")
        source = _source(key, cells["flash_source"])
        flash = Flash(value, cells["method"], source, cells["flash_place"], cells["flash_note"])
    codes = tuple(code for code in cells["hazard_codes"].split(";") if code)
    unknown = sorted(set(codes) - CODES)
    if unknown:
        raise SafetyError(f"{key}: codes {unknown} have no sentence; known: {sorted(CODES)}")
    source = _source(key, cells["hazard_source"]) if codes else ""
    return Row(key, cells["cas"], flash, codes, source, cells["hazard_place"])


def read_table(path: Path = TABLE) -> list[Row]:
    with path.open(encoding="utf-8", newline="") as file:
        rows = [read_row(cells) for cells in csv.DictReader(file)]
    keys = [row.key for row in rows]
    twice = sorted({key for key in keys if keys.count(key) > 1})
    if twice:
        raise SafetyError(f"in the table twice: {twice}")
    return rows


def notes(codes: Sequence[str], flash_point: float | None) -> list[str]:
    """Sentences for the codes, fire first, then the standing one."""
    found = []
    for group in GROUPS:
        clauses = [clause for code, clause in group.items() if code in codes]
        if clauses:
            text = "; ".join(clauses)
            found.append(text[0].upper() + text[1:] + ".")
    if "PART" in codes:
        found.append(PARTIAL)
    if FLAMMABLE & set(codes) or (flash_point is not None and flash_point < FLASH_BELOW):
        found.append(MIST)
    elif flash_point is not None:
        found.append(COMBUSTIBLE)
    return [*found, STANDING]


def text(value: str) -> str:
    return json.dumps(value, ensure_ascii=False)


def flash_lines(flash: Flash) -> list[str]:
    lines = [
        "[flash_point]",
        f"value = {flash.value!r}",
        f"method = {text(flash.method)}",
        f"source = {text(flash.source)}",
        f"place = {text(flash.place)}",
    ]
    return [*lines, f"note = {text(flash.note)}", ""] if flash.note else [*lines, ""]


def hazard_lines(row: Row, flash_point: float | None) -> list[str]:
    return [
        "[hazards]",
        "notes = [",
        *(f"  {text(note)}," for note in notes(row.codes, flash_point)),
        "]",
        f"source = {text(row.source)}",
        f"place = {text(row.place)}",
        "",
    ]


def with_facts(spec: str, row: Row) -> tuple[str, list[str]]:
    """The spec's text with what it lacked, and words on what was done or differs."""
    data: dict[str, Any] = tomllib.loads(spec)
    if data.get("cas", "") != row.cas:
        raise SafetyError(f"{row.key}: CAS {row.cas} in the table, {data.get('cas')} in the spec")
    words = []
    flash: list[str] = []
    hazards: list[str] = []
    flash_point = row.flash.value if row.flash else None
    if "flash_point" in data:
        held = data["flash_point"]
        flash_point = held["value"]
        if row.flash and held["value"] != row.flash.value:
            words.append(
                f"flash point {held['value']:g} K ({held['source']}) kept, the table has "
                f"{row.flash.value:g} K ({row.flash.source})"
            )
    elif row.flash:
        flash = flash_lines(row.flash)
        words.append(f"flash point {row.flash.value:g} K ({row.flash.source}) added")
    if "hazards" in data:
        said = " ".join(data["hazards"]["notes"])
        codes = [code for code in row.codes if code.startswith(("H", "E")) and code not in said]
        if codes:
            words.append(f"hazards kept, they don't name {', '.join(codes)}")
    elif row.codes:
        hazards = hazard_lines(row, flash_point)
        words.append(f"hazards added from {', '.join(row.codes)}")
    if not (flash or hazards):
        return spec, words
    lines = spec.split("\n")
    first = next((i for i, line in enumerate(lines) if line.startswith("[[")), len(lines))
    own = (i for i, line in enumerate(lines[:first]) if re.match(r"\[hazards\]", line))
    lines[first:first] = hazards
    at = next(own, first)
    lines[at:at] = flash
    new = "\n".join(lines)
    tomllib.loads(new)
    return new, words


def main(arguments: Sequence[str]) -> int:
    dry = "--dry-run" in arguments
    wanted = [a for a in arguments if a != "--dry-run"]
    rows = read_table()
    unknown = sorted(set(wanted) - {row.key for row in rows})
    if unknown:
        raise SafetyError(f"not in {TABLE.name}: {unknown}")
    changed = 0
    for row in rows:
        path = SPECS / f"{row.key}.toml"
        if wanted and row.key not in wanted:
            continue
        if not path.exists():
            print(f"{row.key}: no spec")
            continue
        old = path.read_text(encoding="utf-8")
        new, words = with_facts(old, row)
        if words:
            print(f"{row.key}: {'; '.join(words)}")
        if new != old:
            changed += 1
            if not dry:
                path.write_text(new, encoding="utf-8")
    print(f"{changed} specs {'would change' if dry else 'changed'}")
    return 0


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
