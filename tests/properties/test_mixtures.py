"""Mixtures: ends, symmetry, estimates, refusals, salts, published points."""

from __future__ import annotations

import pickle
import warnings

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import (
    BadInput,
    EstimateRefused,
    EstimateWarning,
    MissingProperty,
    OutOfRange,
)

# The surface tension of 2-propanol + water is from memory and warns on use.
pytestmark = pytest.mark.filterwarnings("ignore::dropkit.errors.RecalledWarning")

PAIRS = ["glycerol", "ethanol", "methanol", "2-propanol"]
RULED = ("density", "viscosity", "surface_tension")


def quiet(components, by="mass"):
    return dk.mixture(components, by=by, estimates="allow")


@pytest.mark.parametrize("key", PAIRS)
@pytest.mark.parametrize("prop", RULED)
def test_the_ends_are_the_pure_liquids(key, prop):
    for parts, pure in (({key: 1.0, "water": 0.0}, key), ({key: 0.0, "water": 1.0}, "water")):
        mixed = getattr(quiet(parts), prop)(298.15)
        assert mixed == getattr(dk.liquid(pure), prop)(298.15)
    # and the approach to them has no jump
    near = getattr(quiet({key: 1e-9, "water": "rest"}), prop)(298.15)
    assert near == pytest.approx(getattr(dk.liquid("water"), prop)(298.15), rel=1e-6)


@given(st.sampled_from(PAIRS), st.floats(0.02, 0.98), st.floats(0.05, 0.95), st.sampled_from(RULED))
def test_scalar_array_order_and_a_zero_component_agree(key, share, place, prop):
    one = quiet({key: share, "water": "rest"})
    limits = one.range(prop)
    kelvin = limits.low + place * (limits.high - limits.low)
    value = getattr(one, prop)(kelvin)
    other = getattr(quiet({"water": "rest", key: share}), prop)(kelvin)
    assert other == pytest.approx(value, rel=1e-12)
    many = quiet({key: np.array([share, 0.5]), "water": "rest"})
    assert getattr(many, prop)(kelvin)[0] == pytest.approx(value, rel=1e-12)
    both = getattr(one, prop)(np.array([kelvin, kelvin]))
    assert both == pytest.approx([value, value], rel=1e-12)
    with_zero = quiet({key: share, "water": "rest", "acetone": 0.0})
    assert getattr(with_zero, prop)(kelvin) == pytest.approx(value, rel=1e-12)
    assert with_zero.grade(prop) == one.grade(prop)


@given(st.lists(st.floats(0.05, 1.0), min_size=4, max_size=4), st.permutations(range(4)))
def test_order_of_many_components_does_not_matter(parts, order):
    keys = ["glycerol", "ethanol", "methanol", "water"]
    total = sum(parts)
    shares = {key: part / total for key, part in zip(keys, parts, strict=True)}
    turned = {keys[i]: shares[keys[i]] for i in order}
    for prop in RULED:
        first = getattr(quiet(shares), prop)(298.15)
        assert getattr(quiet(turned), prop)(298.15) == pytest.approx(first, rel=1e-10)


@given(st.floats(0.1, 0.9), st.floats(0.1, 0.9))
def test_many_components_scalar_equals_array(a, b):
    shares = {"glycerol": a * b, "ethanol": a * (1 - b), "water": 1 - a}
    one = quiet(shares)
    many = quiet({key: np.array([share, share]) for key, share in shares.items()})
    for prop in RULED:
        value = getattr(one, prop)(300.0)
        assert getattr(many, prop)(300.0) == pytest.approx([value, value], rel=1e-12)


def test_bases_agree():
    by_mass = quiet({"ethanol": 0.4, "water": 0.6})
    for by in ("mole", "volume"):
        same = quiet(by_mass.fractions(by), by=by)
        assert same.viscosity(298.15) == pytest.approx(by_mass.viscosity(298.15), rel=1e-12)


def test_outside_the_range_of_the_pair():
    spirit = quiet({"ethanol": 0.4, "water": "rest"})
    with pytest.raises(OutOfRange, match="viscosity of ethanol"):
        spirit.viscosity(500.0)
    assert np.isnan(spirit.viscosity(500.0, outside="nan"))


# ------------------------------------------------ estimates


def test_one_warning_when_an_estimate_is_made():
    with pytest.warns(EstimateWarning) as caught:
        dk.mixture({"toluene": 0.3, "n-dodecane": "rest"}, by="mass")
    assert len(caught) == 1
    text = str(caught[0].message)
    assert "viscosity" in text
    assert "estimates='allow'" in text


def test_fitted_pairs_do_not_warn():
    with warnings.catch_warnings():
        warnings.simplefilter("error")
        ink = dk.mixture({"glycerol": 0.3, "water": "rest"}, by="mass")
    assert ink.grade("viscosity") != "estimated"


def test_refuse_refuses():
    mix = dk.mixture({"toluene": 0.3, "n-dodecane": "rest"}, by="mass", estimates="refuse")
    with pytest.raises(EstimateRefused, match="toluene"):
        mix.viscosity(298.15)
    with pytest.raises(BadInput, match="refuse"):
        dk.mixture({"toluene": 0.3, "n-dodecane": "rest"}, by="mass", estimates="maybe")


def test_an_amphiphile_without_its_aqueous_pair_is_refused():
    with pytest.warns(EstimateWarning, match="surface_tension"):
        mix = dk.mixture({"2-butoxyethanol": 0.1, "water": "rest"}, by="mass")
    with pytest.raises(EstimateRefused, match="gathers at the surface"):
        mix.surface_tension(298.15)
    assert mix.viscosity(298.15) > 0
    # without water nothing gathers: an estimate is allowed
    assert quiet({"2-butoxyethanol": 0.1, "toluene": "rest"}).surface_tension(298.15) > 0


@given(st.floats(0.02, 0.5), st.floats(0.02, 0.45))
def test_an_estimate_never_exceeds_the_aqueous_binary_of_an_amphiphile(alcohol, glycerol):
    water = 1.0 - alcohol - glycerol
    mix = quiet({"2-propanol": alcohol, "glycerol": glycerol, "water": water})
    ratio = alcohol / (alcohol + water)
    binary = quiet({"2-propanol": ratio, "water": 1.0 - ratio})
    assert mix.grade("surface_tension") == "estimated"
    assert mix.surface_tension(298.15) <= binary.surface_tension(298.15) * (1 + 1e-12)
    array = quiet({"2-propanol": np.full(2, alcohol), "glycerol": glycerol, "water": water})
    assert array.surface_tension(298.15)[0] == pytest.approx(mix.surface_tension(298.15), rel=1e-12)


def test_estimates_state_their_error():
    mix = quiet({"toluene": 0.3, "n-dodecane": "rest"})
    for prop in RULED:
        assert mix.grade(prop) == "estimated"
        assert mix.uncertainty(prop) > dk.liquid("toluene").uncertainty(prop)


# ------------------------------------------------ salts


def test_salt_in_water_laliberte():
    # Laliberte 2009 as evaluated in the reference of the builder; archive point: 1 mol/kg NaCl,
    # 25 degC, 1036.2 kg/m3 (ThermoML archive, median of papers)
    molality = 1.0
    share = molality * 58.44e-3 / (1 + molality * 58.44e-3)
    brine = quiet({"NaCl": share, "water": "rest"})
    assert brine.density(298.15) == pytest.approx(1036.2, rel=1e-3)
    # Dutcher 2010 evaluates to 75.12 mN/m at 2 mol/kg, 25 degC (correlations seen).
    two = 2 * 58.44e-3 / (1 + 2 * 58.44e-3)
    assert quiet({"NaCl": two, "water": "rest"}).surface_tension(298.15) == pytest.approx(
        75.12e-3, rel=2e-3
    )
    assert brine.viscosity(298.15) > dk.liquid("water").viscosity(298.15)


def test_salt_scalar_equals_array():
    one = quiet({"NaCl": 0.1, "water": "rest"})
    many = quiet({"NaCl": np.array([0.1, 0.2]), "water": "rest"})
    for prop in RULED:
        value = getattr(one, prop)(300.0)
        assert getattr(many, prop)(300.0)[0] == pytest.approx(value, rel=1e-12)


def test_salt_vanishes_into_water():
    thin = quiet({"NaCl": 1e-10, "water": "rest"})
    for prop in RULED:
        pure = getattr(dk.liquid("water"), prop)(298.15)
        assert getattr(thin, prop)(298.15) == pytest.approx(pure, rel=1e-6)


def test_salt_beyond_its_range():
    with pytest.raises(OutOfRange, match="mass fraction"):
        quiet({"NaCl": 0.5, "water": "rest"}).density(298.15)


def test_salt_without_water_is_refused():
    with pytest.raises(MissingProperty, match="without water"):
        quiet({"NaCl": 0.01, "acetone": "rest"}).viscosity(298.15)


def test_salt_in_a_mixed_solvent_is_an_estimate():
    mix = quiet({"NaCl": 0.02, "glycerol": 0.3, "water": "rest"})
    assert mix.grade("viscosity") == "estimated"
    base = quiet({"glycerol": 0.3 / 0.98, "water": "rest"})
    assert mix.viscosity(298.15) > base.viscosity(298.15)


# ------------------------------------------------ the rest of the interface


def test_what_is_not_predicted_says_so():
    ink = quiet({"glycerol": 0.3, "water": "rest"})
    with pytest.raises(MissingProperty, match="not predicted for mixtures"):
        ink.vapour_pressure(298.15)


def test_pickle_keeps_everything():
    ink = quiet({"glycerol": np.array([0.3, 0.4]), "water": "rest"})
    back = pickle.loads(pickle.dumps(ink))
    assert np.array_equal(back.viscosity(300.0), ink.viscosity(300.0))
    assert back.name == ink.name


def test_fire_note_with_a_flammable_component():
    spirit = quiet({"ethanol": 0.2, "water": "rest"})
    text = " ".join(spirit.cautions)
    assert "flash point" in text
    assert "not predicted" in text
    assert "water does not make it non-flammable" in text
    assert "safety data sheet" in text


def test_trail_names_all_records():
    ink = quiet({"glycerol": 0.3, "water": "rest"})
    trail = ink.trail("viscosity", 300.0)
    labels = " ".join(record.record for record in trail.records)
    for part in ("liquids/glycerol", "liquids/water", "mixtures/glycerol__water"):
        assert part in labels
    assert trail.uncertainty > 0
    assert "low shear" in " ".join(trail.cautions)


def test_large_chunks_and_broadcasting():
    share = np.linspace(0.0, 1.0, 40_000)
    ink = quiet({"glycerol": share, "water": "rest"})
    found = ink.density(298.15)
    assert found.shape == share.shape
    assert (np.diff(found) > 0).all()
    grid = quiet({"glycerol": share[:5, None], "water": "rest"}).density(np.array([290.0, 300.0]))
    assert grid.shape == (5, 2)
