"""Sensitivities, tolerance, drift, and stocked holes of a designed stream."""

from __future__ import annotations

import numpy as np
import pytest

import dropkit as dk
from dropkit.design import stream
from dropkit.design.stream_studies import rig_of
from dropkit.errors import BadInput

WATER = dk.liquid("water").at(293.15).si()
ONE = stream(WATER, drop_diameter=100e-6, frequency=20e3)


@pytest.mark.parametrize("hold", ["pressure", "flow"])
@pytest.mark.parametrize("kind", ["tube", "hole", "plate"])
def test_a_rig_gives_the_stream_again(hold, kind):
    found = stream(WATER, drop_diameter=[1e-4, 3e-4], frequency=[2e4, 4e3], nozzle_kind=kind)
    case = rig_of(found, hold)
    again = case.quantities(case.solve())
    for word in ("drop_diameter", "velocity", "jet_diameter", "breakup_length", "gauge_pressure"):
        assert again[word] == pytest.approx(found.found[word], rel=1e-9)


def test_sensitivities_have_their_closed_values():
    # D = (6 q/(pi f))^(1/3): thirds, whatever else happens [C].
    table = ONE.sensitivities(hold="flow")
    assert table.loc["frequency", "drop_diameter"] == pytest.approx(-1 / 3, abs=1e-6)
    assert table.loc["flow", "drop_diameter"] == pytest.approx(1 / 3, abs=1e-6)
    assert table.loc["viscosity", "drop_diameter"] == pytest.approx(0.0, abs=1e-9)
    # At a fixed pressure all lengths and times scale together: the dimensions of a speed.
    at_pressure = ONE.sensitivities()
    assert at_pressure.loc["viscosity", "flow"] < 0
    assert at_pressure.loc["gauge_pressure", "flow"] > 0.5


def test_sensitivities_agree_with_another_design():
    table = ONE.sensitivities()
    changed = stream(
        WATER, gauge_pressure=ONE.gauge_pressure * 1.001, nozzle_diameter=ONE.nozzle_diameter,
        nozzle_length=ONE.nozzle_length, frequency=20e3,
    )  # fmt: skip
    for word in ("drop_diameter", "velocity", "breakup_length"):
        slope = np.log(getattr(changed, word) / getattr(ONE, word)) / np.log(1.001)
        assert table.loc["gauge_pressure", word] == pytest.approx(slope, abs=1e-3)


def test_tolerance_is_a_changed_hole():
    table = ONE.tolerance(hole="2 um")
    wider = stream(
        WATER, gauge_pressure=ONE.gauge_pressure, nozzle_diameter=ONE.nozzle_diameter + 2e-6,
        nozzle_length=ONE.nozzle_length, frequency=20e3,
    )  # fmt: skip
    assert table.loc["hole +2 um", "flow"] == pytest.approx(wider.flow / ONE.flow - 1, rel=1e-6)
    assert (table.loc["hole +5 %"] > 0)[["flow", "drop_diameter"]].all()
    with pytest.raises(BadInput, match="as large as the hole"):
        ONE.tolerance(hole="1 mm")


def test_drift_over_temperature_passes_through_the_design():
    own = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
    window = own.drift((np.array([10.0, 20.0, 30.0]), "degC"))
    assert window.shape == (3,)
    speed = window.si().velocity
    assert speed[1] == pytest.approx(own.si().velocity, rel=1e-9)
    assert np.all(np.diff(speed) > 0)  # thinner when warm, faster at the same pressure
    pumped = own.drift((np.array([10.0, 30.0]), "degC"), hold="flow").si()
    assert pumped.drop_diameter == pytest.approx([100e-6, 100e-6], rel=1e-9)


def test_drift_over_composition_and_refusals():
    ink = dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass")
    found = stream(ink, 298.15, drop_diameter=110e-6, frequency=64e3)
    dried = dk.mixture({"glycerol": np.array([0.38, 0.42]), "water": "rest"}, by="mass")
    window = found.drift(298.15, fluid=dried)
    assert window.velocity[0] == pytest.approx(found.velocity, rel=1e-9)
    assert window.velocity[1] < found.velocity
    with pytest.raises(BadInput, match="not determined"):
        stream(WATER, drop_diameter=1e-4).sensitivities()
    with pytest.raises(BadInput, match="'pressure' or 'flow'"):
        found.sensitivities(hold="hope")
    with pytest.raises(BadInput, match="array of streams"):
        stream(WATER, drop_diameter=[1e-4, 2e-4], frequency=2e4).tolerance()


def test_stocked_holes_are_ranked_and_refused_with_reason():
    table = ONE.alternatives((np.arange(40, 81, 5), "um"))
    assert table["nozzle_diameter [um]"].iloc[0] == pytest.approx(60.0)
    assert table["feasible"].iloc[0]
    wide = table[table["nozzle_diameter [um]"] > 69]
    assert wide["reason"].str.contains("cut-off").all()
    assert not wide["feasible"].any()
    kept = table["margin"][table["feasible"]]
    assert (kept.diff().dropna() <= 0).all()
