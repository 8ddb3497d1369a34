"""Rows of published points: full files as they stand, short ones with their empty cells filled."""

from __future__ import annotations

from pathlib import Path

import pytest

from dropkit.errors import RecordError
from dropkit.published_rows import MARK, filled_rows, mark_of, published_file

HEAD = "component_1,component_2,basis,fraction_1,T_K,property,value,doi"


def test_a_full_file_keeps_its_empty_cells() -> None:
    rows = filled_rows(["# source: x\n", "\n", f"{HEAD}\n", "a,b,mass,0.5,300,density,900,\n"])
    assert rows == [
        {
            **{"component_1": "a", "component_2": "b", "basis": "mass", "fraction_1": "0.5"},
            **{"T_K": "300", "property": "density", "value": "900", "doi": ""},
        }
    ]


def test_empty_cells_of_a_short_file_are_as_above(tmp_path: Path) -> None:
    path = tmp_path / "Able1901.csv"
    path.write_text(
        f"# source: x\n{MARK}\n{HEAD}\n"
        'a,b,mass,0.5,300,density,900.10,"vol. 3, p. 5"\n'
        ",,,,310.0,,890,\n"
        ",,,0.6,,viscosity,0.001,none\n"
        ",c,mole,,320,,0.002,\n"
    )
    assert [tuple(row.values()) for row in published_file(path)] == [
        ("a", "b", "mass", "0.5", "300", "density", "900.10", "vol. 3, p. 5"),
        ("a", "b", "mass", "0.5", "310.0", "density", "890", "vol. 3, p. 5"),
        ("a", "b", "mass", "0.6", "310.0", "viscosity", "0.001", ""),
        ("a", "c", "mole", "0.6", "320", "viscosity", "0.002", ""),
    ]


def test_only_the_columns_named_are_filled() -> None:
    lines = [mark_of(["file", "reason"]), "file,T_K,reason", "x,300,why", ",,", "y,,"]
    assert [tuple(row.values()) for row in filled_rows(lines)] == [
        *(("x", "300", "why"), ("x", "", "why"), ("y", "", "why")),
    ]


@pytest.mark.parametrize(
    ("rows", "message"),
    [
        (["a,,1,x"], "row 1: the column T_K is empty"),
        (["a,300,1,"], "row 1: the column doi is empty.*'none' where there is no doi"),
        (["a,300,1,x", ",,,"], "row 2: the column value is empty"),
    ],
)
def test_what_is_not_above_is_missing(rows: list[str], message: str) -> None:
    with pytest.raises(RecordError, match=message) as caught:
        filled_rows([MARK, "liquid,T_K,value,doi", *rows], "liquids/Able1901")
    assert str(caught.value).startswith("published/liquids/Able1901, row ")


def test_a_row_of_another_length_shows() -> None:
    rows = filled_rows([MARK, "liquid,value,doi", "a,1,x", ",2", ",3,,4"])
    assert rows[1]["doi"] is None
    assert None in rows[2]


def test_no_rows() -> None:
    assert filled_rows([]) == []
    assert filled_rows([MARK, "liquid,value"]) == []
