"""Reading compositions: bases, amounts, the rest, and every slip."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import (
    AmbiguousName,
    BadInput,
    BasisMissing,
    CompositionError,
    NotALiquid,
    UnitError,
    UnknownName,
)
from dropkit.properties.composition import from_mass, read_composition, to_mass


def mass(components, **options):
    composition = read_composition(components, **options)
    return dict(zip(composition.keys, composition.fractions, strict=True))


def test_rest_is_one_minus_the_others():
    assert mass({"glycerol": 0.38, "water": "rest"}, by="mass") == {
        "glycerol": 0.38,
        "water": pytest.approx(0.62, abs=1e-15),
    }


def test_amounts_by_mass_are_normalised():
    found = mass({"glycerol": "380 g", "water": "0.62 kg"})
    assert found["glycerol"] == pytest.approx(0.38, abs=1e-12)


def test_amounts_by_mole_use_molar_masses():
    # One mole each: 92.094 and 18.015 g (CIAAW atomic weights).
    found = mass({"glycerol": "1 mol", "water": "1 mol"})
    assert found["glycerol"] == pytest.approx(92.094 / (92.094 + 18.015), rel=1e-4)


def test_amounts_by_volume_count_before_mixing():
    # 789.24 and 998.20 kg/m3 at 20 degC: OIML R 22 and IAPWS R6-95.
    found = mass({"ethanol": "40 mL", "water": "60 mL"})
    expected = 0.4 * 789.24 / (0.4 * 789.24 + 0.6 * 998.20)
    assert found["ethanol"] == pytest.approx(expected, rel=5e-4)
    note = read_composition({"ethanol": "40 mL", "water": "60 mL"}).assumptions
    assert note == ("volumes before mixing, measured at 20 degC",)


def test_contraction_is_real():
    # OIML R 22: 50 % by mass at 20 degC has 913.77 kg/m3; volumes of the parts add up to more.
    spirit = dk.mixture({"ethanol": 0.5, "water": "rest"}, by="mass")
    parts = 0.5 / dk.liquid("ethanol").density(293.15) + 0.5 / dk.liquid("water").density(293.15)
    contraction = 1.0 - 1.0 / spirit.density(293.15) / parts
    assert contraction == pytest.approx(1 - (1 / 913.77) / (0.5 / 789.24 + 0.5 / 998.20), abs=1e-3)
    assert contraction > 0.03


@pytest.mark.parametrize(
    ("given", "fraction"),
    [("38 wt%", 0.38), ("38 %", 0.38), (0.38, 0.38), (np.float64(0.38), 0.38), ((38, "%"), 0.38)],
)
def test_ways_of_writing_a_mass_fraction(given, fraction):
    found = mass({"glycerol": given, "water": "rest"}, by="mass")
    assert found["glycerol"] == pytest.approx(fraction, abs=1e-15)


def test_percent_that_names_its_basis_needs_no_by():
    assert mass({"glycerol": "38 wt%", "water": "rest"})["glycerol"] == pytest.approx(0.38)


def test_percent_that_contradicts_by():
    with pytest.raises(CompositionError, match="contradict"):
        mass({"glycerol": "38 vol%", "water": "rest"}, by="mass")


def test_arrays_broadcast():
    found = mass({"glycerol": np.array([[0.1], [0.2]]), "ethanol": [0.0, 0.1, 0.2], "water": "rest"},
                 by="mass")  # fmt: skip
    assert {np.shape(w) for w in found.values()} == {(2, 3)}
    assert np.allclose(sum(found.values()), 1.0)


@pytest.mark.parametrize(
    ("components", "options", "error", "says"),
    [
        ({"glycerol": 0.38, "water": "rest"}, {}, BasisMissing, "by=\"mass\""),
        ({"glycerol": "38 %", "water": "rest"}, {}, BasisMissing, "by="),
        ({"glycerol": 38, "water": 62}, {"by": "mass"}, CompositionError, "percent"),
        ({"glycerol": 38, "water": "rest"}, {"by": "mass"}, CompositionError, "percent"),
        ({"glycerol": 0.38, "water": 0.6}, {"by": "mass"}, CompositionError, "rest"),
        ({"glycerol": 0.38, "water": 0.621}, {"by": "mass"}, CompositionError, "normalise=True"),
        ({"glycerol": -0.1, "water": "rest"}, {"by": "mass"}, CompositionError, "-0.1"),
        ({"glycerol": float("nan"), "water": "rest"}, {"by": "mass"}, CompositionError, "NaN"),
        ({"glycerol": float("inf"), "water": "rest"}, {"by": "mass"}, BadInput, "inf"),
        ({"glycerol": True, "water": "rest"}, {"by": "mass"}, BadInput, "True"),
        ({"glycerol": 0.1j, "water": "rest"}, {"by": "mass"}, BadInput, "complex"),
        ({"glycerol": np.array(["a", "b"]), "water": "rest"}, {"by": "mass"}, BadInput, "text"),
        ({"glycerol": "62 g", "water": "1 mol"}, {}, CompositionError, "different kinds"),
        ({"glycerol": "62 g", "water": "rest"}, {}, CompositionError, "every component"),
        ({"glycerol": "62 g", "water": "38 g"}, {"by": "mole"}, CompositionError, "contradicts"),
        ({"glycerol": "rest", "water": "rest"}, {"by": "mass"}, CompositionError, "rest"),
        ({"glycerol": 0.4, "glycerine": 0.6}, {"by": "mass"}, CompositionError, "twice"),
        ({"glicerol": 0.4, "water": "rest"}, {"by": "mass"}, UnknownName, "glycerol"),
        ({"propanol": 0.4, "water": "rest"}, {"by": "mass"}, AmbiguousName, "2-propanol"),
        ({"glycerol": 0.4, "water": "rest"}, {"by": "weight"}, CompositionError, "mass"),
        ({"glycerol": "4 mPa*s", "water": "rest"}, {"by": "mass"}, UnitError, "amount"),
        ({"glycerol": "0 g", "water": "0 g"}, {}, CompositionError, "zero"),
        ({}, {}, CompositionError, "empty"),
        ("water", {}, BadInput, "mapping"),
    ],
)  # fmt: skip
def test_slips_are_named(components, options, error, says):
    with pytest.raises(error) as caught:
        read_composition(components, **options)
    assert says in str(caught.value)


def test_a_solid_alone_is_no_liquid():
    with pytest.raises(NotALiquid, match="solid"):
        dk.liquid("NaCl")
    with pytest.raises(NotALiquid, match="liquid"):
        dk.mixture({"NaCl": 1.0}, by="mass")
    with pytest.raises(CompositionError, match="solid"):
        dk.mixture({"NaCl": "10 mL", "water": "90 mL"})


def test_normalise_scales_a_near_miss():
    found = mass({"glycerol": 0.38, "water": 0.621}, by="mass", normalise=True)
    assert sum(found.values()) == pytest.approx(1.0, abs=1e-15)
    with pytest.raises(CompositionError):
        mass({"glycerol": 0.38, "water": 0.7}, by="mass", normalise=True)


shares = st.lists(st.floats(0.01, 1.0), min_size=3, max_size=3)


@given(shares, st.sampled_from(["mass", "mole", "volume"]))
def test_bases_round_trip(parts, basis):
    keys = ("glycerol", "ethanol", "water")
    total = sum(parts)
    given = tuple(part / total for part in parts)
    back = from_mass(keys, to_mass(keys, given, basis), basis)
    assert back == pytest.approx(given, rel=1e-12)


@given(shares, st.floats(1e-6, 1e6))
def test_scaling_all_amounts_changes_nothing(parts, factor):
    keys = ("glycerol", "ethanol", "water")
    one = to_mass(keys, parts, "mole")
    other = to_mass(keys, [factor * part for part in parts], "mole")
    assert other == pytest.approx(one, rel=1e-12)
