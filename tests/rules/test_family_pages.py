"""The pages of docs/families are what their writer makes of the records as they are now."""

from __future__ import annotations

import importlib.util
from pathlib import Path
from types import ModuleType

import pytest

import dropkit as dk
from dropkit.record_types import LEADING

FOLDER = Path(__file__).resolve().parents[2] / "docs" / "families"


def _writer() -> ModuleType:
    found = importlib.util.spec_from_file_location("write_pages", FOLDER / "write_pages.py")
    assert found is not None
    assert found.loader is not None
    module = importlib.util.module_from_spec(found)
    found.loader.exec_module(module)
    return module


PAGES: dict[str, str] = _writer().pages()


@pytest.mark.parametrize("name", sorted(PAGES))
def test_a_page_says_what_the_records_say(name: str) -> None:
    assert (FOLDER / name).read_text(encoding="utf-8") == PAGES[name], (
        "run: python docs/families/write_pages.py"
    )


def test_there_is_no_page_too_many() -> None:
    assert {path.name for path in FOLDER.glob("*.md")} == set(PAGES)


def test_every_liquid_has_its_picture_and_no_other_has() -> None:
    table = dk.liquids()
    wanted = {
        key
        for key, row in table[table["kind"] == "liquid"].iterrows()
        if any(isinstance(row[name], str) for name in LEADING)
    }
    assert {path.stem for path in (FOLDER / "pictures").glob("*.png")} == wanted


def test_values_stand_beside_their_unit() -> None:
    # water at 20 degC: 1.0016 mPa*s (IAPWS R12-08), 998.2 kg/m3, 72.7 mN/m (IAPWS R1-76)
    page = PAGES["water.md"]
    assert "| viscosity [mPa*s] | 1.00" in page
    assert "| density [kg/m3] | 998." in page
    assert "| surface tension [mN/m] | 72.7" in page


def test_the_readme_counts_what_there_is() -> None:
    readme = (FOLDER.parents[1] / "README.md").read_text(encoding="utf-8")
    kinds = dk.liquids()["kind"].value_counts()
    assert f"It knows {kinds['liquid']} liquids" in readme
    assert f"and {kinds['solute']} salts," in readme
