"""Solutes in water: every record against an independent evaluation, ranges, sums, the polynomial."""

from __future__ import annotations

import math
from pathlib import Path

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit import records
from dropkit.errors import MissingProperty, OutOfRange
from dropkit.properties.mixing.solutions import dissolved, polynomial, solute_fraction
from dropkit.published_rows import published_file

# Every record of a pair with water whose other component is a solute.
SOLUTES = sorted(
    key
    for path in (records.data_dir() / "mixtures").glob("*.toml")
    if "water" in path.stem.split("__")
    for key in path.stem.split("__")
    if records.liquid_record(key).kind == "solute"
)


def block(key, prop):
    """The record's block of a solute in water."""
    pair = records.pair_record(key, "water")
    return pair.properties[prop][0]


def largest(key, prop):
    """Largest mass fraction of the solute in its record."""
    low, high = block(key, prop).parameters["fraction_range"]
    return 1.0 - low if key > "water" else high


BOTH = [
    (key, prop)
    for key in SOLUTES
    for prop in ("density", "viscosity")
    if prop in records.pair_record(key, "water").properties
]
LALIBERTE = [pair for pair in BOTH if block(*pair).form.startswith("laliberte")]


def brine(key, share):
    return dk.mixture({key: share, "water": "rest"}, by="mass", estimates="allow")


def by_thermo(key, prop, share, kelvin):
    """The library thermo's own function on the table's own row, with dropkit's water."""
    from thermo import electrochem

    # manganese(II) sulfate stands in the table under the number of its hydrate
    cas = "449146-65-0" if key == "manganese_ii_sulfate" else records.liquid_record(key).cas
    table = electrochem.Laliberte_data.rename(index=str.strip)
    row = [float(x) for x in table.loc[cas].to_numpy()[3 if prop == "density" else 12 :][:6]]
    water = getattr(dk.liquid("water"), prop)(kelvin)
    if prop == "density":
        salt = electrochem.Laliberte_density_i(kelvin, 1.0 - share, *row[:5])
        return 1.0 / ((1.0 - share) / water + share / salt)
    salt = electrochem.Laliberte_viscosity_i(kelvin, 1.0 - share, *row)
    return math.exp((1.0 - share) * math.log(water) + share * math.log(salt))


def test_there_are_many_solutes():
    assert len(SOLUTES) >= 80
    assert len(LALIBERTE) >= 140


@pytest.mark.parametrize(("key", "prop"), LALIBERTE)
def test_laliberte_as_an_independent_implementation_has_it(key, prop):
    found = block(key, prop)
    for part in (0.1, 0.5, 0.95):
        share = part * largest(key, prop)
        kelvin = found.range.low + part * (found.range.high - found.range.low)
        expected = by_thermo(key, prop, share, kelvin)
        assert getattr(brine(key, share), prop)(kelvin) == pytest.approx(expected, rel=1e-6)


@pytest.mark.parametrize(("key", "prop"), BOTH)
def test_beyond_the_fraction_range_is_refused(key, prop):
    middle = 0.5 * (block(key, prop).range.low + block(key, prop).range.high)
    top = largest(key, prop)
    assert getattr(brine(key, 0.999 * top), prop)(middle) > 0.0
    with pytest.raises(OutOfRange, match="mass fraction"):
        getattr(brine(key, top + 0.002), prop)(middle)


@pytest.mark.parametrize(("key", "prop"), BOTH)
def test_arrays_agree_with_scalars(key, prop):
    middle = 0.5 * (block(key, prop).range.low + block(key, prop).range.high)
    shares = np.array([0.3, 0.6, 0.9]) * largest(key, prop)
    many = getattr(brine(key, shares), prop)(middle)
    one = [getattr(brine(key, float(share)), prop)(middle) for share in shares]
    np.testing.assert_allclose(many, one, rtol=1e-12)


@pytest.mark.parametrize(
    ("key", "prop"), [pair for pair in BOTH if pair != ("nitric_acid", "viscosity")]
)
def test_water_is_the_limit(key, prop):
    middle = 0.5 * (block(key, prop).range.low + block(key, prop).range.high)
    water = getattr(dk.liquid("water"), prop)(middle)
    value = getattr(brine(key, np.array([0.0, 1e-7])), prop)(middle)
    assert value[0] == pytest.approx(water, rel=1e-12)
    assert value[1] == pytest.approx(water, rel=2e-5)


def test_a_formula_that_is_infinite_for_a_pinch_begins_later():
    assert block("nitric_acid", "viscosity").parameters["fraction_range"][0] == 0.001
    with pytest.raises(OutOfRange, match="mass fraction"):
        brine("nitric_acid", 1e-5).viscosity(293.15)


def test_seven_solutions_at_20_degc():
    # CRC Handbook 102nd ed., concentrative properties: kg/m3 and mPa*s at 20 degC.
    table = {
        ("calcium chloride", 0.2): (1177.5, 1.930),
        ("sodium hydroxide", 0.2): (1219.2, 4.619),
        ("lithium chloride", 0.2): (1115.0, 2.128),
        ("KCl", 0.2): (1132.8, 1.012),
        ("zinc sulfate", 0.1): (1107.1, 1.545),
        ("sucrose", 0.5): (1229.5, 15.431),
        ("urea", 0.3): (1081.2, 1.332),
    }
    for (name, share), (density, viscosity) in table.items():
        mix = dk.mixture({name: share, "water": "rest"}, by="mass")
        for value, printed, prop in (
            (mix.density(293.15), density, "density"),
            (mix.viscosity(293.15) * 1e3, viscosity, "viscosity"),
        ):
            allowed = 2.0 * mix.uncertainty(prop)
            assert value == pytest.approx(printed, rel=allowed), (name, prop)


def test_sucrose_density_of_icumsa():
    # Sugar Technologists Manual 1995, on Kell's water at 1 atm: 1229.65 at 50 %, 1286.61 at 60 %,
    # 20 degC. The record of water is the saturated liquid, 0.0047 % less dense.
    for share, value in ((0.5, 1229.65), (0.6, 1286.61), (0.7, 1347.48)):
        assert brine("sucrose", share).density(293.15) == pytest.approx(value, rel=5e-5)


def test_sucrose_viscosity_from_memory():
    # From memory, NBS Circular 440: mPa*s at 20 degC; a wide check, 5 %.
    for share, value in ((0.1, 1.336), (0.3, 3.187), (0.5, 15.43), (0.6, 58.49), (0.7, 481.6)):
        assert brine("sucrose", share).viscosity(293.15) * 1e3 == pytest.approx(value, rel=0.05)


def test_urea_solution_of_the_standard():
    # ISO 22241-1: 1087 to 1093 kg/m3 at 20 degC for 31.8 to 33.2 % urea.
    for share in (0.318, 0.332):
        assert 1086.0 < brine("urea", share).density(293.15) < 1094.0


def test_surface_tension_of_salts():
    # Tables of KCl behind a public repository: 75.13 mN/m at 10 % and 20 degC.
    assert brine("potassium_chloride", 0.1).surface_tension(293.15) == pytest.approx(
        75.13e-3, rel=0.015
    )
    for key in ("calcium_chloride", "magnesium_chloride", "sodium_sulfate", "lithium_chloride"):
        assert brine(key, 0.2).surface_tension(298.15) > dk.liquid("water").surface_tension(298.15)
    with pytest.raises(MissingProperty, match="sucrose"):
        brine("sucrose", 0.2).surface_tension(298.15)


def test_two_salts_add_up_as_published():
    # M. Laliberte's rule as thermo evaluates it, with its own water: the ratio to water compared.
    from thermo import electrochem

    cas, shares = ["7647-14-5", "7447-40-7"], [0.08, 0.05]
    kelvin = 298.15
    mix = dk.mixture({"NaCl": shares[0], "KCl": shares[1], "water": "rest"}, by="mass")
    theirs = electrochem.Laliberte_density(kelvin, shares, cas)
    assert mix.density(kelvin) == pytest.approx(theirs, rel=5e-5)
    theirs = electrochem.Laliberte_viscosity(kelvin, shares, cas)
    assert mix.viscosity(kelvin) == pytest.approx(theirs, rel=3e-3)
    assert mix.grade("viscosity") == "measured"


def test_sugar_and_salt_together_are_an_estimate():
    mix = dk.mixture({"sucrose": 0.3, "NaCl": 0.02, "water": "rest"}, by="mass", estimates="allow")
    assert mix.grade("viscosity") == "estimated"
    sugar, salt = brine("sucrose", 0.3 / 0.98), brine("NaCl", 0.02 / 0.70)
    water = dk.liquid("water").viscosity(293.15)
    product = sugar.viscosity(293.15) * salt.viscosity(293.15) / water
    assert mix.viscosity(293.15) == pytest.approx(product, rel=1e-12)
    assert mix.uncertainty("viscosity", 293.15) > brine("sucrose", 0.3).uncertainty("viscosity")
    # the volumes that the two take up beside the water add up
    volume = 0.98 / sugar.density(293.15) + 0.70 / salt.density(293.15)
    volume -= 0.68 / dk.liquid("water").density(293.15)
    assert mix.density(293.15) == pytest.approx(1.0 / volume, rel=1e-12)


@pytest.mark.parametrize("left", ["sucrose", "sodium_chloride"])
def test_several_solutes_have_no_jump_where_one_vanishes(left):
    shares = {"sucrose": 0.2, "sodium_chloride": 0.1, left: 1e-9}
    mix = dk.mixture({**shares, "water": "rest"}, by="mass", estimates="allow")
    (other,) = [key for key in shares if key != left]
    for prop in ("density", "viscosity"):
        alone = getattr(brine(other, shares[other]), prop)(293.15)
        assert getattr(mix, prop)(293.15) == pytest.approx(alone, rel=1e-7)


def test_a_solute_in_a_mixed_solvent_is_an_estimate():
    mix = dk.mixture(
        {"silver_nitrate": 0.1, "glycerol": 0.3, "water": "rest"}, by="mass", estimates="allow"
    )
    base = dk.mixture({"glycerol": 0.3 / 0.9, "water": "rest"}, by="mass")
    assert mix.grade("density") == "estimated"
    # the whole of what the salt does counts as its error
    effect = math.log(mix.density(293.15) / base.density(293.15))
    assert mix.uncertainty("density", 293.15) >= effect


def test_the_solute_may_be_the_second_component():
    # keys alphabetical: water comes before zinc nitrate, so the record counts water
    low, high = block("zinc_nitrate", "density").parameters["fraction_range"]
    assert (low, high) == (0.405, 1.0)
    assert brine("zinc_nitrate", 0.5).density(298.15) > brine("zinc_nitrate", 0.2).density(298.15)


@given(
    x=st.floats(0.0, 0.9),
    kelvin=st.floats(273.15, 373.15),
    rows=st.lists(st.lists(st.floats(-3.0, 3.0), min_size=1, max_size=4), min_size=1, max_size=4),
)
def test_polynomial_is_its_sum(x, kelvin, rows):
    th = (kelvin - 298.15) / 100.0
    expected = sum(c * x**i * th**j for i, row in enumerate(rows, 1) for j, c in enumerate(row))
    assert polynomial({"coefficients": rows}, x, kelvin) == pytest.approx(expected, abs=1e-12)


@given(x=st.floats(0.0, 0.9), y0=st.floats(1e-4, 2e3), c=st.floats(-0.5, 0.5))
def test_transforms(x, y0, c):
    p = {"coefficients": [[c]], "basis": "mass"}
    log, ratio, linear = (
        dissolved(p | {"transform": how}, y0, x, 298.15) for how in ("log", "ratio", "linear")
    )
    assert log == pytest.approx(y0 * math.exp(c * x), rel=1e-12)
    assert ratio == pytest.approx(y0 * (1.0 + c * x), rel=1e-12)
    assert linear == pytest.approx(y0 + c * x, rel=1e-12, abs=1e-12)


@given(w=st.floats(0.0, 0.99))
def test_mole_fraction(w):
    x = solute_fraction("mole", w, 0.342296, (1.0 - w) / 0.018015268)
    # Genotelle's A = S/(1900 - 18 S) is the mole fraction of sucrose, with 19 for 342.3/18.015.
    assert x == pytest.approx(w / (19.0 - 18.0 * w), rel=2e-3, abs=1e-15)


def test_published_points_of_sucrose_lie_within_the_band():
    path = Path(records.data_dir()) / "published" / "mixtures" / "ThermoMLArchive_sucrose.csv"
    inside = []
    for row in published_file(path):
        mix = dk.mixture({"sucrose": float(row["fraction_1"]), "water": "rest"}, by=row["basis"])
        value = getattr(mix, row["property"])(float(row["T_K"]))
        band = 2.0 * mix.uncertainty(row["property"])
        inside.append(abs(value / float(row["value"]) - 1.0) <= band)
    assert np.mean(inside) >= 0.9
