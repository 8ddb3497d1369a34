"""The tool that adds flash points and hazard notes to specs, and its table."""

from __future__ import annotations

import re
import sys
import tomllib
from pathlib import Path

import pytest

BUILD = Path(__file__).resolve().parents[2] / "data" / "build"
sys.path.append(str(BUILD))

import add_safety_facts as safety  # noqa: E402  the builder is no installed package

SPEC = """name = "invented liquid"
cas = "0-00-0"

[molar_mass]
value = 0.1
source = "PubChem"

[[density]]
form = "constant"
"""
FLASH = safety.Flash(281.0, "closed cup", "NFPA497", "invented liquid", "method from memory")
ROW = safety.Row("invented", "0-00-0", FLASH, ("H225", "H319"), "HazardCodeTables", "0-00-0")
TABLE = safety.read_table()


def cells(**changed: str) -> dict[str, str]:
    flash = {"flash_point_K": "", "method": "", "flash_source": ""}
    flash |= {"flash_place": "", "flash_note": ""}
    hazards = {"hazard_codes": "", "hazard_source": "", "hazard_place": ""}
    return {"key": "invented", "cas": "0-00-0"} | flash | hazards | changed


def test_both_tables_stand_before_the_first_block() -> None:
    new, _ = safety.with_facts(SPEC, ROW)
    data = tomllib.loads(new)
    assert data["flash_point"] == {
        "value": 281.0,
        "method": "closed cup",
        "source": "NFPA497",
        "place": "invented liquid",
        "note": "method from memory",
    }
    assert data["hazards"] == {
        "notes": [
            "Highly flammable liquid and vapour (H225): an ignitable mixture forms above the "
            "liquid at room temperature.",
            "Causes serious eye irritation (H319).",
            safety.MIST,
            safety.STANDING,
        ],
        "source": "HazardCodeTables",
        "place": "0-00-0",
    }
    assert new.index("[molar_mass]") < new.index("[flash_point]") < new.index("[hazards]")
    assert new.index("[hazards]") < new.index("[[density]]")
    added = safety.flash_lines(FLASH) + safety.hazard_lines(ROW, 281.0)
    assert new.replace("\n".join(added) + "\n", "") == SPEC


def test_a_second_run_changes_nothing() -> None:
    new, _ = safety.with_facts(SPEC, ROW)
    assert safety.with_facts(new, ROW) == (new, [])


def test_own_tables_stay_and_differences_are_said() -> None:
    own = SPEC.replace(
        "[[density]]",
        '[flash_point]\nvalue = 280.0\nmethod = "open cup"\nsource = "Own"\n\n'
        '[hazards]\nnotes = ["Burns."]\nsource = "Own"\n\n[[density]]',
    )
    new, words = safety.with_facts(own, ROW)
    assert new == own
    assert words == [
        "flash point 280 K (Own) kept, the table has 281 K (NFPA497)",
        "hazards kept, they don't name H225, H319",
    ]


def test_the_flash_point_of_the_spec_governs_the_mist_sentence() -> None:
    hot = SPEC.replace(
        "[[density]]",
        '[flash_point]\nvalue = 400.0\nmethod = "open cup"\nsource = "Own"\n\n[[density]]',
    )
    new, _ = safety.with_facts(hot, ROW._replace(codes=("H319",)))
    assert tomllib.loads(new)["hazards"]["notes"][1:] == [safety.COMBUSTIBLE, safety.STANDING]


def test_a_wrong_cas_number_is_refused() -> None:
    with pytest.raises(safety.SafetyError, match=r"CAS 1-11-1 in the table, 0-00-0 in the spec"):
        safety.with_facts(SPEC, ROW._replace(cas="1-11-1"))


@pytest.mark.parametrize(
    ("changed", "message"),
    [
        ({"flash_point_K": "24", "method": "closed cup"}, "in kelvin"),
        ({"flash_point_K": "300"}, "names no method"),
        ({"flash_point_K": "300", "method": "closed cup", "flash_source": "Nobody"}, "Nobody"),
        ({"hazard_codes": "H999", "hazard_source": "NFPA497"}, "H999"),
        ({"hazard_codes": "H225", "hazard_source": "Nobody"}, "Nobody"),
    ],
)
def test_a_wrong_row_is_refused(changed: dict[str, str], message: str) -> None:
    with pytest.raises(safety.SafetyError, match=message):
        safety.read_row(cells(**changed))


@pytest.mark.parametrize("row", TABLE, ids=lambda row: str(row.key))
def test_every_row_fits_its_spec(row: safety.Row) -> None:
    spec = (safety.SPECS / f"{row.key}.toml").read_text(encoding="utf-8")
    new, _ = safety.with_facts(spec, row)
    assert ("hazards" in tomllib.loads(new)) >= bool(row.codes)


@pytest.mark.parametrize(
    "row", [r for r in TABLE if r.flash and safety.FLAMMABLE & set(r.codes)], ids=lambda r: r.key
)
def test_fire_codes_agree_with_the_flash_points(row: safety.Row) -> None:
    # Two kinds of source check each other. Bounds of the GHS (from memory): H224 and H225
    # below 23 degC, H226 from there to 60 degC; flash points of two laboratories differ by 3 K.
    assert row.flash is not None
    low, high = (296.15, 333.15) if "H226" in row.codes else (200.0, 296.15)
    assert low - 3.0 <= row.flash.value <= high + 3.0


def test_no_sentence_calls_anything_safe() -> None:
    sentences = [clause for group in safety.GROUPS for clause in group.values()]
    sentences += [safety.STANDING, safety.MIST, safety.COMBUSTIBLE, safety.PARTIAL]
    assert not [s for s in sentences if re.search(r"\bsafe(ly)?\b", s)]
