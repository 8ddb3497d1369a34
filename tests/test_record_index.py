"""The table that choosing reads: made from the records, sealed, and never believed when it is not."""

from __future__ import annotations

import json
from pathlib import Path

import made_up_records as made_up
import pytest

from dropkit import records, sealing
from dropkit.record_index import (
    CHOSEN_BY,
    build_selection,
    index_text,
    read_index,
    read_selection,
    selection_text,
)
from dropkit.record_store import SELECTION, Store


@pytest.fixture
def folder(tmp_path: Path) -> Path:
    return made_up.write(tmp_path / "data")


def test_it_holds_constants_and_blocks_of_every_liquid(folder: Path) -> None:
    held = Store(str(folder)).selection()
    assert list(held) == ["alpha", "beta"]  # gamma is a solute
    alpha = held["alpha"]
    assert alpha["constants"] == {
        "molar_mass": 0.05,
        "melting_point": 260.0,
        "boiling_point": 380.0,
        "critical_temperature": 600.0,
        "flash_point": 290.0,
    }
    assert list(alpha["constants"]) == list(CHOSEN_BY)
    assert alpha["method"] == "closed cup"
    assert alpha["properties"]["viscosity"] == [
        ["vogel", {"coefficients": [-4.0, 500.0, 150.0]}, 260.0, 330.0, 0.01, None, "single"],
        [
            "exp_polynomial",
            {"coefficients": [-0.66666, -0.022], "centre": 300.0},
            *(300.0, 400.0, 0.2, None, "single"),
        ],
    ]
    # One absolute uncertainty, of a check point of 0.02576: its own file says so.
    *_, relative, absolute, grade = alpha["properties"]["surface_tension"][0]
    assert relative == pytest.approx(0.0005 / 0.02576, rel=1e-12)
    assert (absolute, grade) == (0.0005, "reference")
    assert "method" not in held["beta"]


def test_the_table_opens_no_record(folder: Path) -> None:
    store = Store(str(folder))
    assert store.selection() is store.selection()
    for path in (folder / "liquids").glob("*.toml"):
        path.write_text("name = ")
    again = Store(str(folder))
    assert again.selection() == store.selection()
    assert again._liquids == {}


def test_one_line_per_liquid_behind_a_checksum(folder: Path) -> None:
    text = (folder / SELECTION).read_text(encoding="utf-8")
    head, kinds, opening, *lines = text.splitlines()
    assert list(json.loads(head.removesuffix(",") + "}")) == ["note", "records", "seal"]
    assert ["viscosity", "vogel", ["coefficients"], "single"] in json.loads(f"{{{kinds[:-1]}}}")[
        "kinds"
    ]
    assert opening == '"liquids":{'
    assert [line.partition(":")[0] for line in lines] == ['"alpha"', '"beta"', "}}"]


def test_what_is_written_is_read_again(folder: Path) -> None:
    store = Store(str(folder))
    index, selection = store.scan_all()
    assert index_text(index).encode() == (folder / "index.json").read_bytes()
    assert read_index(index_text(index).encode()) == index == store.index()
    text = selection_text(selection).encode()
    assert text == (folder / SELECTION).read_bytes()
    held = read_selection(text, selection["records"])
    assert held == selection["liquids"] == dict(store.selection())
    assert read_selection(text, "other records") is None
    empty = build_selection([])
    assert read_selection(selection_text(empty).encode(), empty["records"]) == {}


@pytest.mark.parametrize(
    "content",
    [None, b"", b"{", b"[]", b"{}", b'{"liquids": 3}', b'{"seal": "", "liquids": {}}', b"\xff"],
)
def test_without_a_good_table_the_records_are_read(folder: Path, content: bytes | None) -> None:
    good = dict(Store(str(folder)).selection())
    if content is None:
        (folder / SELECTION).unlink()
    else:
        (folder / SELECTION).write_bytes(content)
    assert Store(str(folder)).selection() == good


def test_a_number_changed_in_the_table_is_not_believed(folder: Path) -> None:
    made_up.edit(folder, SELECTION, "[1000.0,-0.5]", "[1001.0,-0.5]")
    held = Store(str(folder)).selection()
    assert held["alpha"]["properties"]["density"][0][1]["coefficients"] == [1000.0, -0.5]


def test_line_ends_of_another_system_break_no_checksum(folder: Path) -> None:
    path = folder / SELECTION
    path.write_bytes(path.read_bytes().replace(b"\n", b"\r\n"))
    for record in (folder / "liquids").glob("*.toml"):
        record.write_text("name = ")
    assert list(Store(str(folder)).selection()) == ["alpha", "beta"]


def test_a_table_of_older_records_is_not_believed(folder: Path) -> None:
    old = (folder / SELECTION).read_bytes()
    made_up.edit(folder, "liquids/alpha.toml", "[1000.0, -0.50]", "[1000.2, -0.50]")
    assert sealing.main(["seal", "alpha"], root=folder) == 0
    (folder / SELECTION).write_bytes(old)
    held = Store(str(folder)).selection()
    assert held["alpha"]["properties"]["density"][0][1]["coefficients"] == [1000.2, -0.5]


def test_a_new_liquid_is_found_before_anything_is_sealed(folder: Path) -> None:
    text = made_up.BETA.replace('"beta"', '"delta"').replace("44-32-1", "").replace("BTA", "DTA")
    (folder / "liquids/delta.toml").write_text(text)
    assert list(Store(str(folder)).selection()) == ["alpha", "beta", "delta"]


def test_an_unreadable_record_is_left_out_and_hides_no_other(folder: Path) -> None:
    (folder / "liquids/alpha.toml").write_text("name = ")
    (folder / SELECTION).unlink()
    assert list(Store(str(folder)).selection()) == ["beta"]


def test_check_reports_and_seal_mends_it(folder: Path, capsys: pytest.CaptureFixture[str]) -> None:
    good = (folder / SELECTION).read_bytes()
    made_up.edit(folder, SELECTION, "[1000.0,-0.5]", "[1001.0,-0.5]")
    assert sealing.main(["check"], root=folder) == 1
    assert "data/selection.json does not match the files; run: " in capsys.readouterr().err
    assert (folder / SELECTION).read_bytes() != good
    assert sealing.main(["seal"], root=folder) == 0
    assert (folder / SELECTION).read_bytes() == good
    assert sealing.main(["check"], root=folder) == 0


@pytest.mark.parametrize("name", ["BTA", "b-t-a", "Beta", "44-32-1"])
def test_a_name_in_two_records_writes_neither_file(
    folder: Path, capsys: pytest.CaptureFixture[str], name: str
) -> None:
    before = [(folder / file).read_bytes() for file in ("index.json", SELECTION)]
    made_up.edit(folder, "liquids/alpha.toml", '"first liquid"', f'"{name}"')
    made_up.edit(folder, "liquids/alpha.toml", "[1000.0, -0.50]", "[1000.2, -0.50]")
    for command in ("seal", "check"):
        assert sealing.main([command], root=folder) == 1
        said = capsys.readouterr().err
        assert "two records with one name: '" in said
        assert "liquids/alpha.toml" in said
        assert "liquids/beta.toml" in said
    assert [(folder / file).read_bytes() for file in ("index.json", SELECTION)] == before


def test_the_same_records_give_the_same_text(folder: Path) -> None:
    first, second = (
        selection_text(build_selection([(Store(str(folder)).liquid(key), "0") for key in order]))
        for order in (("alpha", "beta", "gamma"), ("gamma", "beta", "alpha"))
    )
    assert first == second


def test_dropkits_own_table_is_small() -> None:
    # It is read whole by the first choice of a process.
    assert (records.data_dir() / SELECTION).stat().st_size < 350_000
