"""The accuracy that the project promises, measured against every published point it ships."""

from __future__ import annotations

from pathlib import Path

import accuracy
import pandas as pd
import pytest

pytestmark = pytest.mark.filterwarnings("ignore::dropkit.errors.DropkitWarning")

DOCS = Path(__file__).parents[2] / "docs"
ENOUGH = 8  # tabulated points from which a liquid is judged by itself


def listed(heading: str) -> list[list[str]]:
    """Rows of the table under a heading of docs/data-notes.md, where every cause stands.

    A record that improves must leave the list, and none may join it unseen.
    """
    notes = (DOCS / "data-notes.md").read_text(encoding="utf-8")
    section = notes.partition(f"## {heading}\n")[2].partition("\n## ")[0]
    table = [line for line in section.splitlines() if line.startswith("| ")][1:]
    rows = [[cell.strip() for cell in line.strip("|").split("|")] for line in table]
    assert rows
    assert all(all(row) for row in rows)
    return rows


@pytest.fixture(scope="module")
def tables() -> dict[str, pd.DataFrame]:
    return accuracy.tables()


def test_water_meets_iapws(tables):
    assert tables["Water against IAPWS"]["reached"].all()


def test_the_two_chief_mixtures(tables):
    table = tables["Glycerol-water and ethanol-water"]
    assert len(table) >= 10
    assert table["reached"].all(), table[~table["reached"]]


def test_pure_liquids_together(tables):
    table = tables["Pure liquids together, tabulated points"]
    assert set(table["property"]) == {"density", "viscosity", "surface_tension"}
    assert table["points"].min() > 200
    assert table["reached"].all(), table


def test_pure_liquids_one_by_one(tables):
    table = tables["Pure liquids one by one, tabulated points"]
    judged = table[table["points"] >= ENOUGH]
    assert judged["liquid"].nunique() >= 80
    short = judged[~judged["reached"]]
    found = sorted(zip(short["liquid"], short["property"], strict=True))
    assert found == sorted(
        (row[0], row[1]) for row in listed("Liquids that miss the reach one by one")
    )


def test_pairs(tables):
    table = tables["Pairs, by file"]
    assert table["pair"].nunique() >= 100
    short = table[~table["reached"]]
    found = sorted(zip(short["pair"], short["property"], short["file"], strict=True))
    rows = listed("Files of pairs whose median misses the reach")
    assert found == sorted((row[0], row[1], row[2]) for row in rows)


def test_points_beyond_three_times_the_reach_have_a_cause(tables):
    table = tables["Points of pairs beyond three times the reach"]
    stems = table["file"].str.rpartition("/")[2]
    found = table.groupby([table["pair"], table["property"], stems]).size()
    rows = listed("Points of pairs beyond three times the reach")
    assert {tuple(row[:3]): int(row[3]) for row in rows} == found.to_dict()
    # Few: of all points of pairs one in fifty at most.
    assert len(table) < 0.02 * tables["Pairs, by file"]["points"].sum()


def test_excluded_rows_are_few():
    """At most one in twenty of a property's points, for liquids and for pairs."""
    counts: dict[tuple[str, str], list[int]] = {}
    for folder in ("liquids", "mixtures"):
        for path in sorted((accuracy.records.data_dir() / "published" / folder).glob("*.csv")):
            for row in accuracy.published_file(path):
                entry = counts.setdefault((folder, row["property"]), [0, 0])
                entry[0] += 1
                entry[1] += bool(accuracy.exclusion(f"{folder}/{path.stem}", row))
    shares = {what: out / every for what, (every, out) in counts.items() if every >= 40}
    assert len(shares) >= 10
    assert {what: share for what, share in shares.items() if share > 0.05} == {}


def test_the_page_is_current(tables):
    assert (DOCS / "accuracy.md").read_text(encoding="utf-8") == accuracy.page(tables)
