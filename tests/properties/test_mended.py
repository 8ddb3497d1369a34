"""Slips that were found once and must not come back: each fails on the code before its mending."""

from __future__ import annotations

import math
import pickle
import warnings

import numpy as np
import pandas as pd
import pytest

import dropkit as dk
from dropkit.errors import (
    BadInput,
    CompositionError,
    EstimateRefused,
    ImplausibleValue,
    OutOfRange,
)

pytestmark = pytest.mark.filterwarnings("ignore::dropkit.errors.RecalledWarning")


def quiet(components):
    return dk.mixture(components, by="mass", estimates="allow")


def test_a_look_with_nan_does_not_switch_the_range_of_composition_off():
    brine = quiet({"NaCl": 0.5, "water": "rest"})
    assert math.isnan(brine.density(293.15, outside="nan"))
    assert "sodium chloride" in repr(brine)
    assert math.isnan(brine.density(293.15, outside="nan"))
    with pytest.raises(OutOfRange, match="mass fraction"):
        brine.density(293.15)


def test_scalar_and_array_agree_beyond_each_composition_edge():
    for key, edge in (("NaCl", 0.26), ("glycerol", 0.65)):
        for share in np.linspace(edge - 0.02, edge + 0.02, 9):
            for kelvin in (258.15, 293.15):
                one = quiet({key: float(share), "water": "rest"})
                many = quiet({key: np.array([share, share]), "water": "rest"})
                first = one.density(kelvin, outside="nan")
                assert one.density(kelvin, outside="nan") == pytest.approx(first, nan_ok=True)
                assert many.density(kelvin, outside="nan")[0] == pytest.approx(first, nan_ok=True)


def test_nothing_frozen_can_be_written_into():
    kelvin = np.array([300.0, 310.0])
    state = dk.liquid("water").at(kelvin)
    before = state.density.copy()
    kelvin[0] = 350.0
    assert state.temperature[0] == 300.0
    assert np.array_equal(dk.liquid("water").at(state.temperature).density, before)
    share = np.array([0.1, 0.2])
    mix = quiet({"glycerol": share, "water": "rest"})
    share[0] = 0.9
    assert mix.mass_fractions["glycerol"][0] == 0.1
    room = dk.air(np.array([293.15, 303.15]))
    for array in (state.temperature, mix.mass_fractions["glycerol"], room.temperature):
        with pytest.raises(ValueError, match="read-only"):
            array[0] = 1.0


def test_salt_does_not_lift_an_estimate_above_the_aqueous_binary():
    binary = quiet({"2-propanol": 0.1, "water": "rest"}).surface_tension(298.15)
    salted = {"2-propanol": 0.09, "NaCl": 0.10, "water": 0.81}
    assert quiet(salted).surface_tension(298.15) <= binary * (1 + 1e-12)
    many = quiet({key: np.array([w, w]) for key, w in salted.items()})
    assert many.surface_tension(298.15)[0] == pytest.approx(
        quiet(salted).surface_tension(298.15), rel=1e-12
    )


def test_the_range_of_a_salt_counts_salt_and_water_only():
    with pytest.raises(OutOfRange, match=r"sodium chloride in sodium chloride \+ water"):
        quiet({"NaCl": 0.25, "ethanol": 0.70, "water": 0.05}).density(293.15)


def test_an_unknown_uncertainty_stays_unknown():
    ink = quiet({"glycerol": 0.3, "water": "rest"}).with_values(viscosity="4 mPa*s")
    assert ink.uncertainty("kinematic_viscosity", 293.15) is None
    known = quiet({"glycerol": 0.3, "water": "rest"}).with_values(
        viscosity="4 mPa*s", uncertainty={"viscosity": "3 %"}
    )
    assert known.uncertainty("viscosity") == pytest.approx(0.03)
    assert known.uncertainty("kinematic_viscosity") > 0.03


def test_an_own_value_that_leans_on_a_record_names_its_sources():
    base = quiet({"glycerol": 0.3, "water": "rest"})
    mine = base.with_values(viscosity="3 mPa*s", at="20 degC")
    assert mine.trail("viscosity").sources == base.trail("viscosity").sources
    water = dk.liquid("water").with_values(kinematic_viscosity="1.1 cSt")
    assert water.trail("viscosity", 293.15).sources == dk.liquid("water").trail("density").sources


def test_extrapolation_has_no_uncertainty_and_says_so():
    water = dk.liquid("water")
    trail = water.at("200 degC", outside="allow").trail("viscosity")
    assert trail.uncertainty is None
    assert any("extrapolated" in text for text in trail.cautions)
    assert water.trail("viscosity", 300.0).uncertainty > 0
    row = dk.lookup(
        pd.DataFrame({"temperature": [450.0], "liquid": ["water"]}), ["density"], outside="allow"
    )
    assert "extrapolated" in row["reason"].iloc[0]


def test_celsius_without_a_unit_is_noticed():
    with pytest.raises(ImplausibleValue, match="kelvin"):
        dk.fluid("x", density=1000.0, at=25)
    with pytest.raises(ImplausibleValue, match="kelvin"):
        dk.fluid("x", viscosity=[(20, 5e-3), (40, 3e-3)])
    with pytest.raises(ImplausibleValue, match="kelvin"):
        dk.compare("water", at=25)
    with pytest.raises(ImplausibleValue, match="kelvin"):
        dk.mixture({"ethanol": "40 mL", "water": "60 mL"}, measured_at=25)
    with pytest.raises(ImplausibleValue, match="kelvin"):
        dk.plots.property_over_composition("ethanol", "water", property="density", at=20)
    result = dk.lookup(
        pd.DataFrame({"temperature": [20.0], "glycerol": [0.2]}), ["density"], by="mass",
        rest="water",
    )  # fmt: skip
    assert "kelvin expected" in result["reason"].iloc[0]


def test_a_row_without_a_value_has_no_grade():
    frame = pd.DataFrame({"temperature": [300.0, 700.0], "glycerol": [0.2, 0.2]})
    result = dk.lookup(frame, ["density"], by="mass", rest="water")
    assert list(result["grade"]) == ["measured", ""]
    table = dk.compare("water", at=500.0, properties=["density"])
    assert table["water"]["grade"].iloc[0] == "out of range"


@pytest.mark.parametrize("name", ["density [kg/m3]", "grade", "reason"])
def test_a_measured_column_is_not_overwritten(name):
    frame = pd.DataFrame({"temperature": [300.0], "glycerol": [0.2], name: [1.0]})
    with pytest.raises(BadInput, match="already"):
        dk.lookup(frame, ["density"], by="mass", rest="water")


def test_shapes_that_do_not_fit():
    mix = quiet({"glycerol": [0.1, 0.2], "water": "rest"})
    with pytest.raises(BadInput, match="grid"):
        mix.viscosity([293.15, 303.15, 313.15])
    assert quiet({"glycerol": np.array([]), "water": "rest"}).density(293.15).shape == (0,)


def test_a_state_out_of_every_range_still_has_a_table():
    table = dk.liquid("water").at(500.0).table()
    assert list(table["grade"].unique()) == [""]
    assert table["value"].isna().all()
    assert all("out of range" in text for text in table["method"])


def test_liquids_that_do_not_mix_are_refused():
    for parts in ({"n-heptane": 0.5, "water": 0.5}, {"toluene": 0.5, "water": 0.5}):
        with pytest.raises(CompositionError, match="do not mix"):
            quiet(parts)
    with pytest.raises(CompositionError, match="metal"):
        quiet({"mercury": 0.5, "acetone": 0.5})
    frame = pd.DataFrame({"temperature": [300.0], "toluene": [0.5]})
    result = dk.lookup(frame, ["density"], by="mass", rest="water")
    assert "do not mix" in result["reason"].iloc[0]
    told = quiet({"toluene": 0.2, "ethanol": 0.6, "water": 0.2}).trail("density").assumptions
    assert any("one phase" in text for text in told)


def test_refractive_index_without_a_record_is_refused():
    # 40 % ethanol has about 1.358 at 20 degC (from memory); the ideal rule gives 1.346.
    assert quiet({"ethanol": 0.4, "water": "rest"}).refractive_index(293.15) > 1.355
    with pytest.raises(EstimateRefused, match="refractive"):
        quiet({"dimethyl_sulfoxide": 0.4, "water": "rest"}).refractive_index(293.15)


def test_brix_is_sugar():
    with pytest.raises(CompositionError, match="sucrose"):
        dk.mixture({"glycerol": "20 °Bx", "water": "rest"})


def test_own_conductivity_brings_its_caution():
    mine = dk.fluid("varnish", density="900 kg/m3", electrical_conductivity="5 pS/m")
    assert any("static accumulator" in text for text in mine.cautions)


def test_the_plain_twin_carries_the_cautions():
    state = dk.liquid("acetone").at("60 degC")
    assert "flash point" in repr(state)
    assert "needs p >=" in repr(state)


def test_a_pickled_state_needs_no_record():
    state = dk.liquid("ethanol").at("25 degC")
    back = pickle.loads(pickle.dumps(state))
    assert back == state
    assert back._fluid is None
    assert back.viscosity.magnitude == state.viscosity.magnitude


def test_far_extrapolation_is_quiet_about_overflow():
    mine = dk.fluid("x", viscosity=[(300.0, 1e3), (300.001, 1e-3)], plausible=False)
    with warnings.catch_warnings():
        warnings.simplefilter("error", RuntimeWarning)
        warnings.simplefilter("ignore", dk.errors.DropkitWarning)
        assert math.isnan(mine.viscosity(200.0, outside="allow"))


def test_three_components_by_hand():
    """Kohler's extension: each pair at its own ratio; numbers from the records' coefficients."""
    parts = {"ethanol": 0.2, "glycerol": 0.3, "water": 0.5}
    mix = quiet(parts)
    kelvin = 298.15  # th = 0: only the first column of the coefficients counts
    pure = {key: dk.liquid(key) for key in parts}
    specific = sum(w / pure[key].density(kelvin) for key, w in parts.items())
    for key in ("ethanol", "glycerol"):
        rows = dk.records.pair_record(key, "water").properties["density"][0].parameters
        x, y = parts[key], parts["water"]
        ratio = (x - y) / (x + y)
        specific += x * y * sum(row[0] * ratio**k for k, row in enumerate(rows["coefficients"]))
    assert mix.density(kelvin) == pytest.approx(1.0 / specific, rel=1e-12)
    # and the plain difference of fractions would be another number
    assert abs(ratio - (x - y)) > 0.02


def test_a_pinch_does_not_spoil_a_known_mixture():
    known = quiet({"glycerol": 0.38, "water": "rest"})
    pinch = quiet({"glycerol": 0.38, "NaCl": 0.001, "water": "rest"})
    assert pinch.uncertainty("viscosity", 293.15) < 1.1 * known.uncertainty("viscosity", 293.15)
    drop = quiet({"glycerol": 0.38, "ethanol": 1e-3, "water": "rest"})
    half = quiet({"glycerol": 0.38, "ethanol": 0.31, "water": "rest"})
    assert drop.uncertainty("viscosity") < 0.3 * half.uncertainty("viscosity")
    assert drop.grade("viscosity") == "estimated"


def test_uncertainty_of_a_mixture_by_hand():
    mix = quiet({"glycerol": 0.4, "water": "rest"})
    blocks = dk.records.pair_record("glycerol", "water").properties
    assert mix.uncertainty("viscosity", 293.15) == blocks["viscosity"][0].uncertainty
    both = blocks["surface_tension"][0]
    expected = max(both.uncertainty, both.uncertainty_absolute / mix.surface_tension(293.15))
    assert mix.uncertainty("surface_tension", 293.15) == pytest.approx(expected)


@pytest.mark.parametrize("outside", ["nan", "allow", "warn"])
def test_no_policy_changes_what_a_later_look_does(outside):
    brine = quiet({"NaCl": 0.4, "water": "rest"})
    with warnings.catch_warnings():
        warnings.simplefilter("ignore", dk.errors.DropkitWarning)
        brine.density(293.15, outside=outside)
        brine.with_values(surface_tension=0.08).kinematic_viscosity(293.15, outside=outside)
    with pytest.raises(OutOfRange):
        brine.density(293.15)
    with pytest.raises(OutOfRange):
        brine.density("20 degC")


@pytest.mark.parametrize(
    "components",
    [
        {"water": "rest", "ethanol": "rest", "glycerol": [0.1, 0.2]},
        {"ethanol": [0.1, 0.2], "EtOH": [0.3, 0.4], "water": "rest"},
    ],
)
def test_grid_drops_no_component(components):
    with pytest.raises(CompositionError):
        dk.grid(components, [293.15], ["density"], by="mass")


def test_extrapolated_compositions_say_so_in_a_frame():
    for columns, prop in (
        ({"temperature": [293.0], "NaCl": [0.4]}, "density"),
        ({"temperature": [263.0], "glycerol": [0.3]}, "viscosity"),
    ):
        result = dk.lookup(pd.DataFrame(columns), [prop], rest="water", by="mass", outside="allow")
        assert "extrapolated" in result["reason"].iloc[0]


def test_an_own_constant_fills_no_gaps():
    mine = dk.fluid("x", density=1000.0, kinematic_viscosity=1e-6)
    for look in (mine.density, mine.viscosity, mine.kinematic_viscosity):
        assert list(np.isnan(look(np.array([300.0, np.nan])))) == [False, True]


def test_the_band_of_a_plot_is_that_of_the_points_in_range():
    ax = dk.plots.property_over_composition("NaCl", "water", property="density", at="20 degC")
    spans = ax.collections[0].get_paths()[0].vertices[:, 1]
    assert np.ptp(spans) > 0
    width = dk.mixture({"NaCl": 0.1, "water": "rest"}, by="mass").uncertainty("density", 293.15)
    assert width > 0


def test_shapes_are_told_wherever_they_meet():
    many = quiet({"glycerol": np.array([0.1, 0.4, 0.65, 0.95]), "water": "rest"})
    with pytest.raises(BadInput, match="grid"):
        many.uncertainty("viscosity", np.array([293.15, 300.0]))
    with pytest.raises(BadInput, match="grid"):
        many.at(np.array([293.15, 300.0]))
    with pytest.raises(BadInput, match="Series"):
        many.density(pd.Series([293.15]))
    empty = quiet({"glycerol": np.array([]), "water": "rest"})
    assert empty.uncertainty("viscosity", 293.15) is None
    assert "shape (0,)" in repr(empty.at(293.15))


def test_rounding_refuses_no_end_of_a_search():
    for key in ("ethanol", "methanol", "glycerol"):
        for by in ("mass", "mole", "volume"):
            mix = quiet({key: 0.3, "water": "rest"})
            assert mix.find(density=mix.density(293.15), at=293.15, by=by, between=(0, 1))


def test_uncertainties_of_own_values_combine_both_ways():
    spreads = {"kinematic_viscosity": 0.02, "density": 0.01}
    one = dk.fluid("x", density=1000.0, kinematic_viscosity=1e-6, uncertainty=spreads)
    assert one.uncertainty("viscosity") == pytest.approx(math.hypot(0.02, 0.01))


def test_a_sheet_says_why_it_has_no_value():
    mix = dk.mixture(
        {"glycerol": 0.1, "ethanol": 0.1, "water": "rest"}, by="mass", estimates="refuse"
    )
    table = mix.at("20 degC").table()
    assert "no measured record" in table.loc["viscosity", "method"]
    assert "no measured record" in repr(mix)


def test_equal_results_are_equal():
    room = dk.air("20 degC", humidity="50 %")
    assert pickle.loads(pickle.dumps(room)) == room
    sheet = dk.liquid("water").at(300.0).numbers(60e-6, 5.0)
    assert pickle.loads(pickle.dumps(sheet)) == sheet
