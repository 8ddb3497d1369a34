"""A user's own fluid, and measured values on top of a record."""

from __future__ import annotations

import math
import pickle

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import (
    BadInput,
    ImplausibleValue,
    MissingProperty,
    OutOfRange,
    UnitError,
    UnknownName,
)


def coating(**more):
    values = {"density": "1050 kg/m3", "viscosity": "4.2 mPa*s", "surface_tension": "31 mN/m"}
    return dk.fluid("trial coating", **{**values, **more})


def test_constants_at_a_temperature_hold_there_only():
    mine = coating(at="25 degC")
    assert mine.viscosity(298.15) == 4.2e-3
    assert mine.kinematic_viscosity(298.15) == pytest.approx(4.0e-6, rel=1e-12)
    with pytest.raises(OutOfRange, match=r"24\.5 to 25\.5 degC"):
        mine.viscosity("32 degC")
    assert mine.viscosity(305.15, outside="allow") == 4.2e-3


def test_constants_without_a_temperature_hold_everywhere_and_say_so():
    mine = coating()
    assert mine.viscosity(350.0) == 4.2e-3
    assert np.array_equal(mine.viscosity(np.array([300.0, 350.0])), [4.2e-3, 4.2e-3])
    assert "held constant" in mine.trail("viscosity").assumptions[0]
    assert mine.grade() == "own"


def test_pairs_are_joined_by_andrades_line():
    mine = dk.fluid("x", viscosity=[("40 degC", "2.9 mPa*s"), ("20 degC", "5.1 mPa*s")])
    t1, t2, t = 293.15, 313.15, 303.15
    slope = math.log(2.9 / 5.1) / (1 / t2 - 1 / t1)
    expected = 5.1e-3 * math.exp(slope * (1 / t - 1 / t1))
    assert mine.viscosity(t) == pytest.approx(expected, rel=1e-12)
    assert mine.viscosity(t1) == pytest.approx(5.1e-3, rel=1e-12)
    with pytest.raises(OutOfRange):
        mine.viscosity(320.0)


def test_pairs_of_density_are_joined_by_straight_lines():
    mine = dk.fluid("x", density=[(290.0, 1000.0), (300.0, 990.0), (310.0, 970.0)])
    assert mine.density(305.0) == pytest.approx(980.0)
    assert mine.density(np.array([290.0, 295.0])) == pytest.approx([1000.0, 995.0])


def test_kinematic_viscosity_in_gives_dynamic_out():
    mine = dk.fluid("oil", density="900 kg/m3", kinematic_viscosity="50 cSt")
    assert mine.viscosity(300.0) == pytest.approx(0.045, rel=1e-12)
    with pytest.raises(BadInput, match="one of the two"):
        dk.fluid("oil", density=900.0, viscosity=0.045, kinematic_viscosity=5e-5)


@pytest.mark.parametrize(
    ("values", "error", "says"),
    [
        ({"viscosity": "4.2 cSt"}, UnitError, "density"),
        ({"surface_tension": "24 N/m"}, ImplausibleValue, "mN/m"),
        ({"surface_tension": 31}, ImplausibleValue, "mN/m"),
        ({"density": 1.05}, ImplausibleValue, "g/cm3"),
        ({"viscosity": 4.2e3}, ImplausibleValue, "mPa"),
        ({"viscocity": "4.2 mPa*s"}, UnknownName, "viscosity"),
        ({"viscosity": True}, BadInput, "True"),
        ({"viscosity": float("nan")}, BadInput, "nan"),
        ({"viscosity": []}, BadInput, ""),
        ({"viscosity": [(300.0, 1e-3), (300.0, 2e-3)]}, BadInput, "twice"),
        ({}, BadInput, "no values"),
    ],
)
def test_slips_are_named(values, error, says):
    with pytest.raises(error) as caught:
        dk.fluid("x", **values)
    assert says in str(caught.value)


def test_plausible_false_lets_an_odd_value_pass():
    assert dk.fluid("x", surface_tension="24 N/m", plausible=False).surface_tension(300.0) == 24.0


def test_with_values_overrides_and_keeps_the_rest():
    ink = dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass")
    mine = ink.with_values(surface_tension="31 mN/m", electrical_conductivity="1.2 mS/cm")
    assert mine.surface_tension(300.0) == pytest.approx(31e-3, rel=1e-12)
    assert mine.electrical_conductivity(300.0) == pytest.approx(0.12)
    assert mine.viscosity(300.0) == ink.viscosity(300.0)
    assert mine.grade("surface_tension") == "own"
    assert mine.grade("viscosity") == ink.grade("viscosity")
    assert mine.cautions == ink.cautions


def test_with_values_at_a_temperature_follows_the_trend():
    ink = dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass")
    mine = ink.with_values(viscosity="3.4 mPa*s", at="20 degC")
    assert mine.viscosity(293.15) == pytest.approx(3.4e-3, rel=1e-12)
    ratio = mine.viscosity(313.15) / ink.viscosity(313.15)
    assert ratio == pytest.approx(3.4e-3 / ink.viscosity(293.15), rel=1e-12)
    assert mine.viscosity(np.array([293.15]))[0] == pytest.approx(3.4e-3, rel=1e-12)
    assert "trend" in mine.trail("viscosity").assumptions[0]


def test_with_values_on_an_array_of_compositions():
    ink = dk.mixture({"glycerol": np.array([0.2, 0.4]), "water": "rest"}, by="mass")
    mine = ink.with_values(surface_tension="31 mN/m")
    assert mine.surface_tension(300.0) == pytest.approx([31e-3, 31e-3])
    assert mine.viscosity(300.0) == pytest.approx(ink.viscosity(300.0))


def test_own_fluids_pickle():
    mine = coating(at="25 degC")
    mine.viscosity(298.15)
    back = pickle.loads(pickle.dumps(mine))
    assert back.viscosity(298.15) == mine.viscosity(298.15)


def test_missing_property_of_an_own_fluid():
    with pytest.raises(MissingProperty, match="density"):
        coating().vapour_pressure(300.0)


@given(st.floats(274.0, 320.0), st.floats(1.0, 50.0), st.floats(1e-3, 1.0), st.floats(0.1, 0.9))
def test_interpolation_stays_between_its_ends(low, gap, viscosity, ratio):
    mine = dk.fluid("x", viscosity=[(low, viscosity), (low + gap, ratio * viscosity)])
    middle = mine.viscosity(low + 0.5 * gap)
    assert ratio * viscosity < middle < viscosity
