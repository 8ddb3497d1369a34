"""Files of published points in the short form hold the same rows, digit for digit."""

from __future__ import annotations

import csv
import io
import sys
from collections import Counter
from pathlib import Path

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.published_rows import MARK, filled_rows, published_file

BUILD = Path(__file__).resolve().parents[2] / "data" / "build"
sys.path.append(str(BUILD))

from compact_points import FOLDERS, LEAST, compact, compacted, main, wanted  # noqa: E402

PUBLISHED = BUILD.parent / "published"
FILES = [path for folder in FOLDERS for path in sorted((PUBLISHED / folder).glob("*.csv"))]
LIQUID = ["liquid", "property", "T_K", "value", "doi"]
MIXTURE = ["component_1", "component_2", "basis", "fraction_1", "T_K", "property", "value", "doi"]
EXCLUDED = [
    *("file", "component_1", "component_2", "property", "T_K"),
    *("fraction_1", "value", "reason", "contradicting_source"),
]
# Of another kind: every column that has a cell in each row leaves out what repeats.
JETS = ["study", "liquid", "T_K", "fraction_1"]
COMMENTS = ["# source: invented", "# note: a, b"]


def full(columns: list[str], rows: list[dict[str, str]]) -> str:
    """The text of a file with every cell."""
    out = io.StringIO()
    out.writelines(f"{line}\n" for line in COMMENTS)
    writer = csv.DictWriter(out, columns, lineterminator="\n")
    writer.writeheader()
    writer.writerows(rows)
    return out.getvalue()


def counted(rows: list[dict[str, str]]) -> Counter[tuple[tuple[str, str], ...]]:
    return Counter(tuple(sorted(row.items())) for row in rows)


words = st.sampled_from(["a", "b", "1-b", "c d", 'say "x", y', "ä"])
numbers = st.sampled_from(["300", "300.0", "3e2", "0.10", "1"])


@st.composite
def tables(draw: st.DrawFn) -> tuple[list[str], list[dict[str, str]]]:
    """A file of one kind, with few different cells so that they repeat."""
    columns = draw(st.sampled_from([LIQUID, MIXTURE, EXCLUDED, JETS]))
    maybe = {"doi", "component_2", "T_K", "fraction_1", "value"}
    if columns in (LIQUID, MIXTURE):
        maybe = {"doi"}
    cells = {}
    for column in columns:
        cell = numbers if column in ("T_K", "fraction_1", "value") else words
        cells[column] = cell | st.just("") if column in maybe else cell
    return columns, draw(st.lists(st.fixed_dictionaries(cells), min_size=1, max_size=12))


@given(tables())
def test_the_same_rows_come_back(table: tuple[list[str], list[dict[str, str]]]) -> None:
    columns, rows = table
    text = full(columns, rows)
    short = compacted(text)
    assert counted(filled_rows(short.splitlines())) == counted(rows)
    assert short.splitlines()[: len(COMMENTS)] == COMMENTS
    # Once short it stays as it is, and what is added to it in full finds its place.
    assert compacted(short) == short
    said = {column: cell or ("none" if column == "doi" else "") for column, cell in rows[0].items()}
    added = compacted(short + full(columns, [said]).splitlines()[-1] + "\n")
    assert counted(filled_rows(added.splitlines())) == counted([*rows, rows[0]])


def test_rows_keep_their_order_where_nothing_tells_them_apart() -> None:
    rows = [
        {"liquid": name, "property": "density", "T_K": T, "value": value, "doi": ""}
        for name, T, value in [("b", "310", "2"), ("a", "300", "1"), ("b", "290", "3")]
    ]
    lines = compacted(full(LIQUID, rows)).splitlines()
    assert lines == [
        *(*COMMENTS, MARK, ",".join(LIQUID)),
        *("a,density,300,1,none", "b,density,310,2,", ",,290,3,"),
    ]


@pytest.mark.parametrize(
    ("row", "message"),
    [
        ("a,density,300,1", "another number of cells"),
        ("a,density,300,1,x,y", "another number of cells"),
        ("a,density,300,1,none", "the doi is 'none'"),
        ("a,,300,1,x", "the column property is empty"),
    ],
)
def test_what_could_not_be_told_from_a_repeat_is_refused(row: str, message: str) -> None:
    with pytest.raises(ValueError, match=message):
        compacted(f"{','.join(LIQUID)}\n{row}\n")


@pytest.mark.parametrize("path", FILES, ids=lambda path: f"{path.parent.name}/{path.stem}")
def test_a_real_file_written_in_full_is_made_the_same(path: Path) -> None:
    text = path.read_text(encoding="utf-8")
    rows = published_file(path)
    comments = [line for line in text.splitlines() if line.startswith("#") and line != MARK]
    out = io.StringIO()
    out.writelines(f"{line}\n" for line in comments)
    writer = csv.DictWriter(out, list(rows[0]), lineterminator="\n")
    writer.writeheader()
    writer.writerows(rows)
    short = compacted(out.getvalue(), path.stem)
    assert counted(filled_rows(short.splitlines())) == counted(rows)
    if MARK in text.splitlines():
        assert short == text


def test_a_folder_is_written_checked_and_left_alone(
    tmp_path: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    for folder in FOLDERS:
        (tmp_path / folder).mkdir()
    row = {"liquid": "a", "property": "density", "T_K": "300", "value": "1", "doi": "x"}
    small, large = tmp_path / "liquids/Small1.csv", tmp_path / "liquids/Large1.csv"
    small.write_text(full(LIQUID, [row]))
    large.write_text(full(LIQUID, [row] * LEAST))
    before = small.read_text()
    assert main(["--check"], tmp_path) == 1
    assert "liquids/Large1.csv is not in the short form" in capsys.readouterr().out
    assert main([], tmp_path) == 0
    assert main(["--check"], tmp_path) == 0
    assert small.read_text() == before
    assert large.stat().st_size < len(full(LIQUID, [row] * LEAST)) / 2
    assert not compact(large)


def test_the_long_files_are_in_the_short_form() -> None:
    paths = [*FILES, PUBLISHED / "excluded.csv"]
    long = [path.name for path in paths if wanted(path) != path.read_text(encoding="utf-8")]
    assert not long, "run: python data/build/compact_points.py"
