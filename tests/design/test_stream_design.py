"""`stream`: worked values, units, refusals, display, passage through JSON and pickle."""

from __future__ import annotations

import json
import pickle

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.design import Stream, stream
from dropkit.errors import (
    BadInput,
    ImplausibleValue,
    MissingProperty,
    OutOfRange,
    RangeWarning,
    UnitError,
    UnknownName,
)
from dropkit.properties.state import State

WATER = dk.liquid("water").at(293.15).si()
ONE = {"drop_diameter": 100e-6, "frequency": 20e3}


def test_flow_and_frequency_make_the_published_drop():
    # models.md 1.9 [C]: 1 mL/min at 10 kHz gives 147.1013672 um.
    found = stream(WATER, flow=1e-6 / 60, frequency=10e3)
    assert found.drop_diameter == pytest.approx(147.1013672e-6, rel=1e-9)


def test_vibrating_orifice_by_its_formula():
    # models.md 1.9: 0.139 mL/min at 60 kHz, formula 41.9344765 um [C]; 20 um taken for the jet.
    found = stream(WATER, flow="0.139 mL/min", frequency="60 kHz", jet_diameter="20 um")
    assert found.drop_diameter.to("um").magnitude == pytest.approx(41.9344765, rel=1e-8)


@pytest.mark.parametrize(
    ("ratio", "drop"), [(3.5, 1.73801332244), (4.5, 1.88988157484), (7.0, 2.18975956994)]
)
def test_drop_over_jet(ratio, drop):
    # models.md 1.9 [C].
    found = stream(WATER, jet_diameter=50e-6, velocity=10.0, wavelength_ratio=ratio)
    assert found.drop_ratio == pytest.approx(drop, rel=1e-10)
    assert found.wavelength == pytest.approx(ratio * 50e-6, rel=1e-12)


def test_pressure_of_a_plate_is_that_of_a_loss_free_jet():
    # models.md 1.10 [C]: water (998, 0.0728), 50 um jet, 100 kPa gives 13.94866052 m/s without
    # losses. A thin plate adds its viscous entry, 3 pi mu U/d, a few per cent here, no more.
    own = dk.fluid("w", density=998.0, viscosity=1e-5, surface_tension=0.0728, at=293.15)
    found = stream(
        own, 293.15, gauge_pressure=1e5, jet_diameter=50e-6, nozzle_kind="plate",
        frequency=40e3, nozzle_length=1e-9,
    )  # fmt: skip
    assert found.velocity == pytest.approx(13.94866052, rel=1e-3)
    assert found.velocity < 13.94866052


@given(st.floats(20e-6, 1e-3), st.floats(20.0, 2000.0))
def test_volume_is_kept(drop, weber):
    # Invariant: drops per second times their volume is the flow, and wave times area a drop.
    jet = drop / 1.9
    frequency = (weber * 0.0727 / (998.2 * jet)) ** 0.5 / (4.6 * jet)
    found = stream(WATER, drop_diameter=drop, frequency=frequency, holes=7, outside="allow")
    assert found.frequency * found.drop_volume == pytest.approx(found.flow, rel=1e-12)
    assert found.total_flow == pytest.approx(7 * found.flow, rel=1e-12)
    assert found.velocity == pytest.approx(found.frequency * found.wavelength, rel=1e-12)
    area = np.pi / 4 * found.jet_diameter**2
    assert area * found.wavelength == pytest.approx(found.drop_volume, rel=1e-12)
    parts = (found.pressure_kinetic, found.pressure_entry, found.pressure_viscous,
             found.pressure_capillary)  # fmt: skip
    assert found.gauge_pressure == pytest.approx(sum(parts), rel=1e-12)


def test_more_viscosity_lowers_flow_and_slows_breakup_at_equal_pressure():
    viscosities = np.array([1e-3, 2e-3, 5e-3, 1e-2])
    times, flows = [], []
    for viscosity in viscosities:
        own = dk.fluid("v", density=1000.0, viscosity=viscosity, surface_tension=0.05, at=293.15)
        found = stream(
            own, 293.15, gauge_pressure=6e5, nozzle_diameter=60e-6, nozzle_length=6e-4,
            wavelength_ratio=5.0,
        )  # fmt: skip
        flows.append(found.flow)
        times.append(found.breakup_time)
    assert np.all(np.diff(flows) < 0)
    assert np.all(np.diff(times) > 0)


def test_drive_shortens_the_jet_and_the_three_amplitudes_differ():
    base = stream(WATER, **ONE)
    radius = stream(WATER, **ONE, radius_amplitude=0.01 * base.jet_diameter / 2)
    speed = stream(WATER, **ONE, velocity_amplitude=0.01 * base.velocity)
    assert radius.breakup_length < base.breakup_length
    assert speed.breakup_length < radius.breakup_length
    assert radius.radius_amplitude == pytest.approx(0.01 * base.jet_diameter / 2)
    with pytest.raises(BadInput, match="both given"):
        stream(WATER, **ONE, radius_amplitude=1e-7, velocity_amplitude=0.1)


# ---------------------------------------------------------------- what it says
def test_assumptions_are_listed():
    listed = stream(WATER, **ONE).assumptions
    for word in ("wavelength_ratio", "holes", "nozzle_length", "gas_density", "drive"):
        assert any(note.startswith(word) for note in listed), word
    full = stream(WATER, velocity=5.0, **ONE, holes=3, nozzle_length=1e-3, gas_density=1.1)
    left = {note.split(":")[0] for note in full.assumptions}
    assert not left & {"wavelength_ratio", "holes", "nozzle_length", "gas_density"}


def test_what_stays_undetermined_says_so():
    found = stream(WATER, drop_diameter=100e-6)
    assert {"velocity", "gauge_pressure", "frequency", "nozzle_diameter"} <= set(found.undetermined)
    assert "jet_diameter" not in found.undetermined
    assert found.jet_diameter == pytest.approx(100e-6 / 1.906, rel=2e-3)
    assert found.criteria().loc["jetting", "verdict"] == "undetermined"


def test_criteria_carry_value_limit_margin_source_and_verdict():
    table = stream(
        WATER, **ONE, pressure_limit="0.3 bar", shear_limit=1e7, breakup_before="5 cm"
    ).criteria()
    assert table.loc["pressure", "verdict"] == "needs more pressure than allowed"
    assert table.loc["pressure", "margin"] < 0
    assert table.loc["wall shear", "met"] == 1.0
    assert table.loc["breakup", "met"] == 1.0
    band = table.loc["wavelength"]
    # The band at 0.8 of the maximum, water: close to the 3.5 to 7 of low viscosity.
    assert band["low"] == pytest.approx(3.5, rel=0.06)
    assert band["high"] == pytest.approx(7.0, rel=0.06)
    assert "SchneiderHendricks1964" in band["note"]
    assert (table["source"] != "").all()


def test_slow_jets_fail_and_fast_ones_are_blown_apart():
    slow = stream(WATER, jet_diameter=100e-6, velocity=0.5)
    assert slow.criteria().loc["jetting", "verdict"] == "too slow, drips"
    assert slow.feasible is False
    fast = stream(WATER, jet_diameter=100e-6, velocity=60.0)
    assert fast.criteria().loc["regime", "verdict"] == "first wind-induced"
    assert fast.criteria().loc["laminar", "verdict"] == "turbulent in the hole"
    assert any("pierce skin" in text for text in fast.cautions)
    assert not any("pierce skin" in text for text in slow.cautions)


def test_report_and_sources():
    text = stream("acetone", "20 degC", drop_diameter="100 um", frequency="20 kHz").report()
    for word in ("Given", "Assumed", "Criteria", "Cautions", "flash point", "Chandrasekhar"):
        assert word in text
    assert "safe " not in text.casefold().replace("safety", "")


# ---------------------------------------------------------------- refusals
def test_beyond_cut_off_is_refused_on_the_jet_diameter():
    with pytest.raises(OutOfRange, match=r"1\.68 jet diameters.*33\.5.* um"):
        stream(WATER, jet_diameter="20 um", drop_diameter="30 um", frequency="60 kHz")
    with pytest.raises(OutOfRange, match=r"63\.66 kHz"):
        stream(WATER, velocity="10 m/s", jet_diameter="50 um", frequency="80 kHz")


@pytest.mark.parametrize(
    ("given_words", "slip"),
    [
        ({"drop_diameter": 50e-6, "frequency": 2e4, "flow": 1.0472e-8}, "radius of the drop"),
        ({"jet_diameter": 25e-6, "nozzle_diameter": 50e-6, "frequency": 2e4}, "radius of the jet"),
        ({**ONE, "jet_diameter": 25e-6, "velocity": 5.33}, "radius of the jet"),
        ({**ONE, "total_flow": 1.0472e-7}, "10 holes"),
        ({**ONE, "holes": 10, "flow": 1.0472e-7}, "of one hole and that of all"),
    ],
)
def test_contradictions_name_the_likely_slip(given_words, slip):
    with pytest.raises(BadInput, match=slip):
        stream(WATER, **given_words)


def test_gauge_for_absolute_is_seen():
    base = stream(WATER, **ONE, nozzle_diameter=60e-6)
    with pytest.raises(BadInput, match="absolute pressure"):
        stream(WATER, **ONE, nozzle_diameter=60e-6, gauge_pressure=base.gauge_pressure + 101325.0)
    with pytest.raises(UnitError, match="gauge"):
        stream(WATER, **ONE, gauge_pressure="3 bara")


def test_sets_that_agree_pass_with_rounded_numbers():
    found = stream(WATER, **ONE, flow="0.628 mL/min")
    assert found.flow.to("mL/min").magnitude == pytest.approx(0.6283, rel=1e-3)


def test_what_no_pressure_drives():
    with pytest.raises(OutOfRange, match="surface tension alone holds back"):
        stream(WATER, nozzle_diameter="50 um", gauge_pressure="1 kPa")


def test_flashing_liquids_are_refused():
    with pytest.raises(OutOfRange, match="flashes"):
        stream("propane", "20 degC", **ONE)


def test_plain_slips():
    with pytest.raises(UnknownName, match="frequency"):
        stream(WATER, drop_diameter=1e-4, frequncy=2e4)
    with pytest.raises(BadInput, match="nothing is given"):
        stream(WATER)
    with pytest.raises(BadInput, match="do not broadcast"):
        stream(WATER, drop_diameter=[1e-4, 2e-4], frequency=[1e4, 2e4, 3e4])
    with pytest.raises(ImplausibleValue, match="um"):
        stream(WATER, drop_diameter=110.0, frequency=2e4)
    with pytest.raises(BadInput, match="temperature is missing"):
        stream("water", **ONE)
    with pytest.raises(BadInput, match="already"):
        stream(WATER, 300.0, **ONE)
    with pytest.raises(BadInput, match="whole number"):
        stream(WATER, **ONE, holes=2.5)
    bare = dk.fluid("bare", density=1000.0, viscosity=1e-3, at=293.15)
    with pytest.raises(MissingProperty, match="surface_tension"):
        stream(bare, 293.15, **ONE)


def test_policy_for_arrays():
    frequency = np.array([1e3, 20e3, np.nan, 50e3])
    options = {"drop_diameter": 100e-6, "nozzle_diameter": 60e-6}
    found = stream(WATER, frequency=frequency, **options, outside="nan")
    assert np.isnan(found.velocity).tolist() == [True, False, True, False]
    assert found.reason.tolist()[1:] == ["", "", ""]
    assert "cut-off" in found.reason[0]
    with pytest.raises(OutOfRange, match="1 of 4 designs"):
        stream(WATER, frequency=frequency, **options)
    with pytest.warns(RangeWarning, match="1 of 4"):
        kept = stream(WATER, frequency=frequency, **options, outside="warn")
    assert np.isfinite(kept.velocity[0])


# ---------------------------------------------------------------- forms
def test_units_in_units_out():
    with_units = stream(WATER, drop_diameter="100 um", frequency="20 kHz")
    assert f"{with_units.drop_diameter:.0f}" == "100 micrometer"
    bare = stream(WATER, **ONE)
    assert type(bare.velocity) is float
    assert with_units.si().velocity == bare.velocity
    assert bare.with_units().velocity == with_units.velocity
    grid = stream(WATER, drop_diameter=np.array([[1e-4], [2e-4]]), frequency=[1e4, 2e4, 3e4])
    assert grid.flow.shape == (2, 3)
    one = stream(WATER, drop_diameter=2e-4, frequency=3e4)
    assert grid.flow[1, 2] == pytest.approx(one.flow, rel=1e-12)


def test_json_and_pickle_bring_it_back():
    for found in (
        stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz"),
        stream(WATER, drop_diameter=1e-4, frequency=[1e4, 2e4], pressure_limit=1e5),
    ):
        data = json.loads(json.dumps(found.to_dict()))
        assert Stream.from_dict(data) == found
        assert pickle.loads(pickle.dumps(found)) == found
    with pytest.raises(BadInput, match="no dict of a Stream"):
        Stream.from_dict({"kind": "State"})


def test_it_is_frozen_and_shows_itself():
    found = stream(WATER, **ONE)
    with pytest.raises(AttributeError, match="frozen"):
        found.velocity = 3.0
    with pytest.raises(ValueError, match="read-only"):
        stream(WATER, drop_diameter=1e-4, frequency=[1e4, 2e4]).found["velocity"][0] = 1.0
    assert "jet_diameter" in repr(found)
    assert found._repr_html_().count("<table>") == 2
    table = found.table()
    assert table.loc["frequency", "origin"] == "given"
    assert table.loc["velocity", "origin"] == "follows"
    assert isinstance(found.state, State)
    assert "Rayleigh1878" in dk.cite(found)
