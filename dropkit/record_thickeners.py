"""What a thickener's data file may hold: intrinsic viscosities of one polymer, read strictly.

``data/README.md`` describes the format. An entry is one material, or one relation over molar mass,
in one solvent at stated salt concentrations; never a viscosity per percent.
"""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final, cast

from dropkit.provenance import GRADES, Grade
from dropkit.record_schema import _Reader, _tables
from dropkit.record_types import PropertyRecord, Table, ThickenerRecord

__all__ = ["CHARGES", "ENTRY_FORMS", "INTRINSIC", "LAWS", "read_thickener"]

INTRINSIC: Final = "intrinsic_viscosity"
CHARGES: Final = ("neutral", "anionic")
ENTRY_FORMS: Final = ("mark_houwink", "sample")
LAWS: Final = ("huggins", "huggins_power", "martin")

_KEYS: Final = (
    "name",
    "cas",
    "charge",
    "surface_active",
    "surface_reason",
    "synonyms",
    "cautions",
    "seal",
    INTRINSIC,
)
_ENTRY_KEYS: Final = (
    "form",
    "material",
    "solvent",
    "salt",
    "salt_concentration",
    "molar_mass_range",
    "factor",
    "exponent",
    "unit",
    "values",
    "cooling_factor",
    "cooling_from",
    "law",
    "constants",
    "constant_exponent",
    "limits",
    "law_uncertainty",
    "range",
    "uncertainty",
    "grade",
    "sources",
    "place",
    "obtained",
    "checks",
    "cautions",
    "points",
    "note",
    "reason",
)
_CHECK_KEYS: Final = (
    *("T", "molar_mass", "salt", "concentration", "value", "source", "place", "tolerance"),
    "intrinsic",
)
# Of an entry: what is no number of its equation.
_PROVENANCE: Final = (
    "form",
    "range",
    "uncertainty",
    "grade",
    "sources",
    "place",
    "obtained",
    "checks",
    "cautions",
    "points",
    "note",
    "reason",
)


def read_thickener(key: str, data: Mapping[str, Any]) -> ThickenerRecord:
    """Read the parsed file of a thickener.

    Parameters
    ----------
    key : str
        Name of the file without ``.toml``.
    data : mapping
        Its parsed content.

    Returns
    -------
    ThickenerRecord
        The frozen record.

    Raises
    ------
    RecordError
        Naming file, key and what is wrong.
    """
    reader = _Reader(f"thickeners/{key}.toml", data)
    reader.only(_KEYS)
    active = data.get("surface_active")
    if not isinstance(active, bool):
        reader.fail("surface_active", f"is {active!r}", "true or false")
    entries = data.get(INTRINSIC)
    if not _tables(entries):
        reader.fail(INTRINSIC, "is no list of entries", f"[[{INTRINSIC}]] with double brackets")
    charge = reader.choice("charge", CHARGES)
    blocks = tuple(
        _entry(
            _Reader(reader.file, entry, f"{INTRINSIC} {number}"),
            f"thickeners/{key}: {INTRINSIC} {number}",
            charge,
        )
        for number, entry in enumerate(entries, 1)
    )
    return ThickenerRecord(
        key=key,
        name=reader.text("name"),
        cas=reader.text("cas", ""),
        charge=charge,
        surface_active=active,
        surface_reason=reader.text("surface_reason"),
        synonyms=reader.texts("synonyms"),
        cautions=reader.texts("cautions"),
        properties=Table({INTRINSIC: blocks}),
    )


def _numbers(reader: _Reader, key: str, lowest: float, count: int | None = None) -> list[float]:
    value = reader.data.get(key)
    if not isinstance(value, list) or not value or (count and len(value) != count):
        reader.fail(key, f"is {value!r}", f"a list of {count or 'one or more'} numbers")
    found = [reader.a_number(key, part) for part in value]
    if min(found) < lowest:
        reader.fail(key, f"is {value!r}", f"numbers of at least {lowest:g}")
    return found


def _entry(reader: _Reader, label: str, charge: str) -> PropertyRecord:
    reader.only(_ENTRY_KEYS)
    form = reader.choice("form", ENTRY_FORMS)
    for key in ("material", "solvent", "place", "obtained"):
        reader.text(key)
    salts = _salts(reader, charge)
    reader.interval("molar_mass_range", "molar mass", "kg/mol")
    if form == "mark_houwink":
        for key in ("factor", "exponent", "unit"):
            reader.number(key, lowest=0.0)
    else:
        _numbers(reader, "values", 0.0, salts)
    law = reader.choice("law", LAWS)
    _numbers(reader, "constants", 0.0, salts)
    if law == "huggins_power":
        reader.number("constant_exponent")
    limits = _numbers(reader, "limits", 0.0, salts)
    if min(limits) <= 0.0:
        reader.fail("limits", f"is {limits}", "numbers above zero: the largest c[eta]")
    reader.number("law_uncertainty", lowest=0.0)
    if "cooling_factor" in reader.data:
        reader.number("cooling_factor", lowest=0.0)
        reader.number("cooling_from", lowest=0.0)
    uncertainty = reader.number("uncertainty", lowest=0.0)
    sources = reader.texts("sources")
    if not sources:
        reader.fail("sources", "is missing", "at least one source key: no source, no record")
    reasons = {key: reader.text(key) for key in ("note", "reason") if key in reader.data}
    return PropertyRecord(
        property=INTRINSIC,
        label=label,
        form=form,
        parameters=Table({k: v for k, v in reader.data.items() if k not in _PROVENANCE}),
        range=reader.interval("range", "temperature", "K"),
        mixture_range=None,
        uncertainty=uncertainty,
        uncertainty_absolute=None,
        grade=cast(Grade, reader.choice("grade", GRADES)),
        sources=sources,
        place=reader.text("place"),
        obtained=reader.text("obtained"),
        second=None,
        left_out=None,
        checks=_checks(reader),
        cautions=reader.texts("cautions"),
        points=reader.texts("points"),
        reasons=Table(reasons),
    )


def _salts(reader: _Reader, charge: str) -> int:
    """How many salt concentrations an entry states: one for a neutral polymer."""
    reader.text("salt", "")
    stated = _numbers(reader, "salt_concentration", 0.0)
    if sorted(set(stated)) != stated:
        reader.fail("salt_concentration", f"is {stated}", "numbers in rising order [mol/m3]")
    if charge == "neutral" and len(stated) > 1:
        reader.fail("salt_concentration", f"is {stated}", "one number for a neutral polymer")
    if charge != "neutral" and not (reader.data.get("salt") and stated[0] > 0.0):
        reader.fail("salt_concentration", f"is {stated}", "above zero, with its salt: a charged "
                    "polymer has no intrinsic viscosity without salt")  # fmt: skip
    return len(stated)


def _checks(reader: _Reader) -> tuple[Table, ...]:
    rows = reader.data.get("checks")
    if not _tables(rows):
        reader.fail("checks", "has no check point", "at least one published relative viscosity")
    for number, row in enumerate(rows, 1):
        check = _Reader(reader.file, row, f"{reader.where}: check {number}")
        check.only(_CHECK_KEYS)
        for key in ("T", "molar_mass", "concentration", "value", "tolerance"):
            check.number(key, lowest=0.0)
        check.number("salt")
        check.number("intrinsic", lowest=0.0, required=False)
        check.text("source")
        check.text("place", "")
    return tuple(map(Table, rows))
