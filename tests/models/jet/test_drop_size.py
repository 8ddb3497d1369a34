"""Drops by conservation of volume, drive frequency, jet speed.

Marks: [C] computed elsewhere from the closed formula; [M] the case is remembered; [S2] seen in
someone else's copy.
"""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.models import jet
from dropkit.published_rows import published_file
from dropkit.records import data_dir

sizes = st.floats(1e-6, 1e-2)


def test_drop_from_flow() -> None:
    assert jet.drop_diameter_from_flow(1e-6 / 60, 1e4) == pytest.approx(147.1013672e-6, rel=1e-9)
    # A worked value that is remembered: 20 um orifice, 0.139 mL/min, 60 kHz [M]; by formula [C]
    found = jet.drop_diameter_from_flow("0.139 mL/min", "60 kHz")
    assert found.to("um").magnitude == pytest.approx(41.9344765, rel=1e-8)


@pytest.mark.parametrize(
    ("wave", "drop"),
    [(3.5, 1.73801332244), (4.5, 1.88988157484), (7.0, 2.18975956994)],  # [C]
)
def test_drop_from_wavelength(wave: float, drop: float) -> None:
    assert jet.drop_diameter_from_wavelength(1.0, wave) == pytest.approx(drop, rel=1e-11)


def test_drop_of_the_most_unstable_wave() -> None:
    wave = jet.most_unstable_wavelength_inviscid(1.0)
    drop = jet.drop_diameter_from_wavelength(1.0, wave)
    assert drop == pytest.approx(1.89088678275, rel=1e-11)  # [C]


def test_no_drop_below_the_cut_off() -> None:
    # The smallest drop that a wave can cut off: (1.5 pi)^(1/3) = 1.68 jet diameters.
    drop = jet.drop_diameter_from_wavelength(1.0, jet.cut_off_wavelength(1.0))
    assert drop == pytest.approx(1.6765, abs=1e-4)


@given(sizes, st.floats(1.0, 1e6))
def test_flow_and_drops_are_inverse(diameter: float, frequency: float) -> None:
    flow = jet.flow_from_drop(diameter, frequency)
    assert jet.drop_diameter_from_flow(flow, frequency) == pytest.approx(diameter, rel=1e-13)
    assert jet.frequency_from_drop(flow, diameter) == pytest.approx(frequency, rel=1e-13)


@given(sizes, sizes)
def test_wave_and_drops_are_inverse(jet_diameter: float, wavelength: float) -> None:
    drop = jet.drop_diameter_from_wavelength(jet_diameter, wavelength)
    assert jet.wavelength_from_drop(jet_diameter, drop) == pytest.approx(wavelength, rel=1e-13)


@given(sizes, st.floats(0.1, 100.0), st.floats(10.0, 1e6))
def test_both_ways_to_the_drop_agree(d: float, velocity: float, frequency: float) -> None:
    wave = jet.drive_wavelength(velocity, frequency)
    flow = jet.jet_flow(velocity, d)
    by_wave = jet.drop_diameter_from_wavelength(d, wave)
    assert jet.drop_diameter_from_flow(flow, frequency) == pytest.approx(by_wave, rel=1e-12)
    assert jet.drive_frequency(velocity, wave) == pytest.approx(frequency, rel=1e-14)
    assert jet.jet_velocity(flow, d) == pytest.approx(velocity, rel=1e-14)


def test_natural_drops_of_asset_and_bales() -> None:
    """Mean drops of four natural jets, 1951 [S2]: thin jets make Rayleigh's drops, thick ones don't."""
    ratios = {}
    for row in published_file(data_dir() / "published" / "jets" / "AssetBales1951.csv"):
        d = float(row["jet_diameter_m"])
        wave = jet.most_unstable_wavelength_inviscid(d)
        expected = jet.drop_diameter_from_wavelength(d, wave) / d
        ratios[d, row["liquid"]] = float(row["D10_over_d"]) / expected
    assert len(ratios) == 4
    thin = [ratio for (d, _), ratio in ratios.items() if d < 1e-3]
    assert all(0.93 < ratio < 1.04 for ratio in thin)
    thick = [ratio for (d, _), ratio in ratios.items() if d > 1e-3]
    assert all(0.5 < ratio < 0.7 for ratio in thick)  # as the model's statement says


def test_units() -> None:
    frequency = jet.drive_frequency("10 m/s", "270.4 um")
    assert frequency.to("kHz").magnitude == pytest.approx(36.982, rel=1e-4)
    # 10 mL/min through 100 um: 1.6667e-7 m3/s over 7.854e-9 m2
    velocity = jet.jet_velocity("10 mL/min", "100 um")
    assert velocity.to("m/s").magnitude == pytest.approx(21.2207, rel=1e-5)
