"""Measurements on a rig: made up from known values, they must give these back."""

from __future__ import annotations

import math

import numpy as np
import pytest

import dropkit as dk
from dropkit.design import stream
from dropkit.errors import BadInput

WATER = dk.liquid("water").at(293.15).si()
ONE = stream(WATER, drop_diameter=100e-6, frequency=20e3)


def test_weighed_flow_gives_the_coefficient_that_predicts_it():
    rig = ONE.calibrate(gauge_pressure=[4e4, 4e4], mass_flow=[1.0e-5, 1.02e-5])
    assert rig.spreads["discharge_coefficient"] == pytest.approx(
        0.02 / 1.01 / math.sqrt(2), rel=1e-3
    )
    again = stream(WATER, gauge_pressure=4e4, frequency=20e3, **rig.inputs())
    assert again.mass_flow == pytest.approx(1.01e-5, rel=1e-3)
    # Its own flow and pressure give what the models expect.
    own = ONE.calibrate(gauge_pressure=ONE.gauge_pressure, flow=ONE.flow)
    assert own.values["discharge_coefficient"] == pytest.approx(
        own.expected["discharge_coefficient"], rel=1e-12
    )


def test_strobed_pitch_gives_speed_diameter_and_contraction():
    rig = ONE.calibrate(pitch=ONE.wavelength, frequency=20e3, flow=ONE.flow)
    assert rig.values["velocity"] == pytest.approx(ONE.velocity)
    assert rig.values["jet_diameter"] == pytest.approx(ONE.jet_diameter)
    assert rig.values["contraction"] == pytest.approx(ONE.contraction)


def test_counted_drops_give_their_mass():
    rig = ONE.calibrate(count=1e6, mass="0.523 g")
    assert rig.values["drop_mass"] == pytest.approx(5.23e-10)
    assert rig.table().loc["drop_mass", "unit"] == "ng"


def test_lengths_at_voltages_give_growth_and_amplitude():
    # Made up: 5 m/s, growth of the design, 2 nm of radius per volt.
    growth, per_volt = ONE.growth_rate, 2e-9
    volts = np.array([5.0, 10.0, 20.0, 40.0])
    lengths = ONE.velocity / growth * np.log(0.5 * ONE.jet_diameter / (per_volt * volts))
    rig = ONE.calibrate(voltage=volts, breakup_length=lengths)
    assert rig.values["growth_rate"] == pytest.approx(growth, rel=1e-9)
    assert rig.values["radius_amplitude_per_volt"] == pytest.approx(per_volt, rel=1e-9)
    again = stream(
        WATER, frequency=20e3, gauge_pressure=ONE.gauge_pressure, nozzle_length=ONE.nozzle_length,
        **rig.inputs(voltage=10.0),
    )  # fmt: skip
    assert again.breakup_length == pytest.approx(lengths[1], rel=1e-6)


@pytest.mark.parametrize(
    ("measured", "message"),
    [
        ({}, "nothing is given"),
        ({"gauge_pressure": 1e5}, "without flow"),
        ({"voltage": 5.0, "breakup_length": 1e-3}, "one voltage"),
        ({"voltage": [5.0, 9.0], "breakup_length": [1e-3, 2e-3]}, "does not fall"),
        ({"voltage": [5.0, 9.0, 12.0], "breakup_length": [2e-3, 1e-3]}, "3 points"),
        ({"count": [1e6, math.nan], "mass": 1e-3}, "NaN"),
    ],
)
def test_bad_measurements(measured, message):
    with pytest.raises(BadInput, match=message):
        ONE.calibrate(**measured)
    with pytest.raises(BadInput, match="not calibrated"):
        ONE.calibrate(count=1e6, mass=1e-3).inputs(voltage=5.0)
