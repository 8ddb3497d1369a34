"""The builder on two liquids in contact: invented points, specs and liquids."""

from __future__ import annotations

import csv
import sys
import tomllib
from pathlib import Path

import pytest

ROOT = Path(__file__).resolve().parents[2]
sys.path.append(str(ROOT / "data" / "build"))

from record_builder.command import build_record  # noqa: E402  the builder is not installed

NAME = "interfaces/other__testol"
SPEC = """components = ["other", "testol"]

[[interfacial_tension]]
form = "polynomial"
degree = 1
range = [280.0, 320.0]
fit = [{ file = "interfaces/Lab2000" }]
second = [{ file = "interfaces/Lab2001" }]
source_uncertainty = 0.01
place = "Table 1"
"""


def points(root: Path, file: str, factor: float = 1.0, steps: int = 5) -> None:
    """Tensions that fall by 0.1 mN/m per kelvin, and a row of another pair."""
    lines = ["# source: invented", "liquid_1,liquid_2,T_K,value,doi", "other,water,300,0.09,"]
    for number in range(steps):
        T = 280.0 + 40.0 * number / (steps - 1)
        lines.append(f"other,testol,{T},{factor * (0.05 - 1e-4 * (T - 300.0))!r},")
    (root / "published" / "interfaces" / f"{file}.csv").write_text("\n".join(lines) + "\n")


@pytest.fixture
def folder(tmp_path: Path) -> Path:
    for name in ("liquids", "interfaces", "published/interfaces", "build/specs/interfaces"):
        (tmp_path / name).mkdir(parents=True)
    for key in ("other", "testol"):
        (tmp_path / "liquids" / f"{key}.toml").write_text(f'name = "{key}"\n')
    points(tmp_path, "Lab2000")
    points(tmp_path, "Lab2001", 1.01, steps=3)
    (tmp_path / "build" / "specs" / f"{NAME}.toml").write_text(SPEC)
    return tmp_path


def test_a_spec_becomes_a_record_with_residuals(folder: Path) -> None:
    assert build_record(NAME, folder) == []
    record = tomllib.loads((folder / f"{NAME}.toml").read_text(encoding="utf-8"))
    assert record["components"] == ["other", "testol"]
    (block,) = record["interfacial_tension"]
    assert block["grade"] == "measured"
    assert block["second"]["points"] == 3
    assert block["second"]["median"] == pytest.approx(0.01, rel=0.02)
    assert block["uncertainty"] == pytest.approx(0.01)
    assert "fraction_range" not in block
    a, b = block["coefficients"]
    middle, half = block["centre"], block["scale"]
    assert a + b * (310.0 - middle) / half == pytest.approx(0.049, rel=1e-9)
    with (folder / "build" / "residuals" / f"{NAME}.csv").open(encoding="utf-8") as lines:
        roles = [row["role"] for row in csv.DictReader(lines)]
    assert roles.count("fit") == 5
    assert roles.count("second") == 3


def test_laboratories_that_differ_by_more_than_traces_are_refused(folder: Path) -> None:
    points(folder, "Lab2001", 1.06)
    (problem,) = build_record(NAME, folder)
    assert "Lab2001 disagrees by 5.66 %" in problem
    assert not (folder / f"{NAME}.toml").exists()


def test_an_excluded_point_is_not_used(folder: Path) -> None:
    points(folder, "Lab2001", 1.06, steps=3)
    (folder / "published" / "excluded.csv").write_text(
        "file,component_1,component_2,property,T_K,fraction_1,value,reason,contradicting_source\n"
        "interfaces/Lab2001,other,testol,interfacial_tension,,,,invented,Lab2000\n"
    )
    (problem,) = build_record(NAME, folder)
    assert "no independent second source" in problem


def test_a_liquid_that_is_not_there_yet_is_named(folder: Path) -> None:
    (folder / "liquids" / "testol.toml").unlink()
    assert build_record(NAME, folder) == [
        f"{NAME}: testol has no record yet; build the liquid before"
    ]


def test_a_name_that_its_components_do_not_make_is_refused(folder: Path) -> None:
    wrong = folder / "build" / "specs" / "interfaces" / "other__testool.toml"
    wrong.write_text(SPEC)
    assert build_record("interfaces/other__testool", folder) == [
        "interfaces/other__testool: components do not make that name"
    ]
