"""Which composition or temperature gives a property."""

from __future__ import annotations

import json
import pickle

import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import BadInput, ImplausibleValue, UnitError, UnknownName
from dropkit.properties.search import Found


@pytest.fixture
def ink():
    return dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass")


def test_find_a_composition(ink):
    found = ink.find(viscosity="4.5 mPa*s", at="20 degC", vary="glycerol")
    assert len(found) == 1
    (fluid,) = found.fluids
    assert fluid.viscosity(293.15) == pytest.approx(4.5e-3, rel=1e-8)
    # Segur & Oberstar 1951: 40 % has 3.72, 50 % has 6.00 mPa*s at 20 degC.
    assert 0.40 < found.solutions[0] < 0.50
    assert "glycerol by mass" in found.message


def test_none_says_what_it_reaches(ink):
    found = ink.find(viscosity="0.2 mPa*s", at="20 degC", vary="glycerol")
    assert not found
    assert found.solutions == []
    assert "none" in found.message
    assert "reaches from" in found.message


def test_all_solutions_are_found():
    # The density of water has its maximum at 3.98 degC, so 2 and nearly 6 degC have the same.
    water = dk.liquid("water")
    found = water.find(density=water.density(275.15))
    assert len(found) == 2
    assert found.solutions[0] == pytest.approx(275.15, abs=1e-4)
    assert found.solutions[1] == pytest.approx(279.11, abs=0.1)
    # Ethanol-water viscosity has a maximum: two compositions give 2 mPa*s at 20 degC.
    spirit = dk.mixture({"ethanol": 0.5, "water": "rest"}, by="mass")
    two = spirit.find(viscosity="2 mPa*s", at="20 degC", vary="ethanol")
    assert len(two) == 2


def test_what_is_in_the_tank(ink):
    by_density = ink.find(density="1.10 g/cm3", at="20 degC", vary="glycerol")
    # Bosart & Snoddy 1927: 40 % has 1.0997 g/cm3 at 20 degC (from their table, see the record).
    assert by_density.solutions[0] == pytest.approx(0.40, abs=0.005)
    by_index = ink.find(refractive_index=1.3841, at="20 degC", vary="glycerol")
    # Glycerine Producers' Association 1963: 40 % has n_D 1.38413.
    assert by_index.solutions[0] == pytest.approx(0.40, abs=0.01)


def test_find_a_temperature(ink):
    found = ink.find(viscosity="2 mPa*s")
    assert ink.viscosity(found.values[0]) == pytest.approx(2e-3, rel=1e-8)
    assert str(found.solutions[0].units) == "degree_Celsius"
    bare = ink.find(viscosity=2e-3)
    assert type(bare.solutions[0]) is float


def test_the_rest_gives_way():
    mix = dk.mixture({"glycerol": 0.2, "ethanol": 0.1, "water": "rest"}, by="mass",
                     estimates="allow")  # fmt: skip
    found = mix.find(viscosity="3 mPa*s", at="25 degC", vary="glycerol")
    parts = found.fluids[0].mass_fractions
    assert parts["ethanol"] == pytest.approx(0.1, abs=1e-12)
    assert sum(parts.values()) == pytest.approx(1.0, abs=1e-12)


def test_without_a_rest_the_others_keep_their_ratio():
    mix = dk.mixture({"glycerol": 0.2, "ethanol": 0.2, "water": 0.6}, by="mass", estimates="allow")
    parts = mix.find(viscosity="3 mPa*s", at="25 degC", vary="glycerol").fluids[0].mass_fractions
    assert parts["water"] / parts["ethanol"] == pytest.approx(3.0, rel=1e-9)


@pytest.mark.parametrize(
    ("options", "error", "says"),
    [
        ({"viscosity": "4.5 mPa*s", "vary": "glycerol"}, BadInput, "at="),
        ({"viscosity": "4.5 mPa*s", "at": "20 degC", "vary": "acetone"}, UnknownName, "glycerol"),
        ({"at": "20 degC", "vary": "glycerol"}, BadInput, "one property"),
        ({"viscosity": "4.5 cSt", "at": "20 degC", "vary": "glycerol"}, UnitError, "density"),
        ({"surface_tension": 40, "at": "20 degC", "vary": "glycerol"}, ImplausibleValue, "mN/m"),
        ({"viscosity": float("nan"), "at": 293.15, "vary": "glycerol"}, BadInput, "nan"),
        ({"viscosity": 1e-3, "at": 293.15, "vary": "temperature"}, BadInput, "at="),
        ({"viscosity": 1e-3, "at": 293.15, "vary": "glycerol", "between": (0.5, 0.2)},
         BadInput, "rising"),
    ],
)  # fmt: skip
def test_slips_are_named(ink, options, error, says):
    with pytest.raises(error) as caught:
        ink.find(**options)
    assert says in str(caught.value)


def test_a_result_travels(ink):
    found = ink.find(viscosity="4.5 mPa*s", at="20 degC", vary="glycerol")
    table = found.table()
    assert len(table) == 1
    assert table["glycerol [wt%]"].iloc[0] == pytest.approx(100 * found.solutions[0], rel=1e-12)
    again = Found.from_dict(json.loads(json.dumps(found.to_dict())))
    assert again.message == found.message
    assert again.fluids[0].viscosity(293.15) == pytest.approx(4.5e-3, rel=1e-8)
    assert pickle.loads(pickle.dumps(found)).solutions == found.solutions
    assert set(dk.cite(found)) == set(dk.cite(again))
    assert ink.find(viscosity="0.2 mPa*s", at="20 degC", vary="glycerol").table().empty
    with pytest.raises(BadInput, match="to_dict"):
        Found.from_dict({})


@given(st.floats(0.02, 0.95), st.sampled_from(["mass", "mole", "volume"]))
def test_find_inverts_the_look_up(share, by):
    ink = dk.mixture({"glycerol": share, "water": "rest"}, by=by)
    wanted = ink.density(298.15)
    found = ink.find(density=wanted, at=298.15, vary="glycerol", by=by)
    assert min(abs(x - share) for x in found.solutions) < 1e-8
