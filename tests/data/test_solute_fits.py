"""Fits of a solid in water where the right answer is known, and the specs made from Laliberte's table."""

from __future__ import annotations

import sys
import tomllib
from pathlib import Path

import numpy as np
import pytest

BUILD = Path(__file__).resolve().parents[2] / "data" / "build"
sys.path.append(str(BUILD))

import laliberte_specs  # noqa: E402  the builder is no installed package
from record_builder import BuildError, Refused  # noqa: E402
from record_builder.points import Published  # noqa: E402
from record_builder.solutes import SOLUTE_FORMS, fit_polynomial  # noqa: E402
from record_builder.subjects import Pure  # noqa: E402

MASSES = (0.342296, 0.018015268)
T, W = (grid.ravel() for grid in np.meshgrid([283.15, 293.15, 313.15], np.linspace(0.05, 0.6, 7)))
SOLVENT = 1e-3 * np.exp(-0.02 * (T - 293.15))
ROOTS = np.ones_like(T)
TRUE = [[2.0, -0.5], [1.5]]


def fitted(transform: str, basis: str, y: np.ndarray, **block: object) -> dict:
    given = {"rows": 2, "columns": [2, 1], "transform": transform, "basis": basis} | block
    return fit_polynomial(given, T, W, y, SOLVENT, MASSES, ROOTS, "test")


@pytest.mark.parametrize("transform", ["log", "ratio", "linear"])
@pytest.mark.parametrize("basis", ["mass", "mole"])
@pytest.mark.parametrize("shape", [{}, {"centre": 293.15, "scale": 50.0}])
def test_the_very_coefficients_come_back(transform, basis, shape):
    true = {"transform": transform, "basis": basis, "coefficients": TRUE} | shape
    y = SOLUTE_FORMS["solute_polynomial"](true, T, W, SOLVENT, MASSES)
    found = fitted(transform, basis, y, **shape)
    for row, expected in zip(found["coefficients"], TRUE, strict=True):
        assert row == pytest.approx(expected, rel=1e-8)
    assert {name: found.get(name) for name in shape} == shape
    again = SOLUTE_FORMS["solute_polynomial"](found, T, W, SOLVENT, MASSES)
    np.testing.assert_allclose(again, y, rtol=1e-10)


def test_without_solute_it_is_the_solvent():
    p = {"transform": "log", "basis": "mole", "coefficients": TRUE}
    value = SOLUTE_FORMS["solute_polynomial"](p, T, 0.0 * W, SOLVENT, MASSES)
    np.testing.assert_array_equal(value, SOLVENT)


def test_what_the_points_do_not_bear_is_refused():
    y = SOLVENT * np.exp(W)
    with pytest.raises(Refused, match="21 points for 21 coefficients"):
        fitted("log", "mass", y, rows=7, columns=3)
    with pytest.raises(Refused, match="bear"):
        fitted("log", "mass", y, rows=2, columns=4)  # three temperatures for four powers
    with pytest.raises(BuildError, match="allowed: log, ratio, linear"):
        fitted("reciprocal", "mass", y)
    with pytest.raises(BuildError, match="allowed: mass, mole"):
        fitted("log", "volume", y)
    with pytest.raises(BuildError, match="does not go with"):
        fitted("log", "mass", y, columns=[1])


@pytest.fixture(scope="module")
def rows():
    return {row.key: row for row in laliberte_specs.table()}


def test_the_table_is_read_as_printed(rows):
    # Sodium sulfate in the data file of chemicals 1.5.2, first and last coefficients and ranges.
    row = rows["sodium_sulfate"]
    assert row.cas == "7757-82-6"
    assert row.ranges["density"] == pytest.approx((273.15, 398.15))
    assert laliberte_specs.span(row, "density") == (273.15, 373.15)
    assert row.points == {"density": 402, "viscosity": 222}
    assert laliberte_specs.molar_mass(row.formula) == pytest.approx(0.142042, rel=1e-5)


@pytest.mark.parametrize(
    "key", ["potassium_chloride", "zinc_nitrate", "sodium_dihydrogen_phosphate"]
)
def test_the_specs_are_what_the_script_writes(key, rows):
    published = Published(BUILD.parent / "published")
    water = Pure.load(BUILD.parent / "liquids", "water")
    pair = "__".join(sorted((key, "water")))
    spec = tomllib.loads((BUILD / "specs" / "mixtures" / f"{pair}.toml").read_text("utf-8"))
    for prop in ("density", "viscosity"):
        compared = laliberte_specs.Compared(rows[key], prop, published, water)
        written = tomllib.loads("\n".join(laliberte_specs._block(compared)))[prop][0]
        assert written == spec[prop][0]


def test_a_range_ends_where_the_second_source_parts(rows):
    published = Published(BUILD.parent / "published")
    water = Pure.load(BUILD.parent / "liquids", "water")
    phosphate = laliberte_specs.Compared(
        rows["sodium_dihydrogen_phosphate"], "viscosity", published, water
    )
    assert phosphate.end == 0.1  # the table goes to 29.9 %, 14 % off at 26 %
    assert "-14" in phosphate.parted


def test_faulty_rows_are_passed_over(rows):
    published = Published(BUILD.parent / "published")
    water = Pure.load(BUILD.parent / "liquids", "water")
    faults = {
        "cadmium_chloride": "no value",
        "potassium_nitrite": "rises",
        "sodium_sulfite": "0.2 %",
    }
    for key, words in faults.items():
        assert words in laliberte_specs.Compared(rows[key], "viscosity", published, water).physical
    assert laliberte_specs.wanted(rows["aluminium_chloride"]) == "viscosity rests on 5 points"
