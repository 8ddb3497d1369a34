"""Drive frequency and wavelength: values by hand, scaling, and what is refused."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import UnitError, Unphysical
from dropkit.models import jet

speeds = st.floats(1e-3, 1e3)
lengths = st.floats(1e-7, 1e-1)
frequencies = st.floats(1e-1, 1e7)
factors = st.floats(1e-3, 1e3)


def test_by_hand() -> None:
    # 18 m/s over 450 um: 40 000 waves a second; 12 m/s at 25 kHz: one wave every 480 um
    assert jet.drive_frequency(18.0, 450e-6) == pytest.approx(40e3, rel=1e-14)
    assert jet.drive_wavelength(12.0, 25e3) == pytest.approx(480e-6, rel=1e-14)


def test_by_hand_with_units() -> None:
    frequency = jet.drive_frequency("1080 m/min", "0.45 mm")  # 18 m/s
    assert str(frequency.units) == "kilohertz"
    assert frequency.magnitude == pytest.approx(40.0, rel=1e-14)
    wavelength = jet.drive_wavelength("12 m/s", "25 kHz")
    assert str(wavelength.units) == "micrometer"
    assert wavelength.magnitude == pytest.approx(480.0, rel=1e-14)
    # 1 500 000 revolutions a minute are 25 000 a second
    turned = jet.drive_wavelength("12 m/s", "1500000 rpm")
    assert turned.magnitude == pytest.approx(480.0, rel=1e-14)


def test_arrays() -> None:
    found = jet.drive_frequency(np.array([[9.0], [18.0]]), np.array([300e-6, 450e-6, np.nan]))
    np.testing.assert_allclose(found, [[30e3, 20e3, np.nan], [60e3, 40e3, np.nan]], rtol=1e-14)


@given(speeds, lengths, factors)
def test_frequency_scales_with_speed_over_wavelength(u: float, wave: float, by: float) -> None:
    base = jet.drive_frequency(u, wave)
    assert jet.drive_frequency(by * u, wave) == pytest.approx(by * base, rel=1e-13)
    assert jet.drive_frequency(u, by * wave) == pytest.approx(base / by, rel=1e-13)
    assert jet.drive_frequency(by * u, by * wave) == pytest.approx(base, rel=1e-13)


@given(speeds, frequencies, factors)
def test_wavelength_scales_with_speed_over_frequency(u: float, f: float, by: float) -> None:
    base = jet.drive_wavelength(u, f)
    assert jet.drive_wavelength(by * u, f) == pytest.approx(by * base, rel=1e-13)
    assert jet.drive_wavelength(u, by * f) == pytest.approx(base / by, rel=1e-13)


@given(speeds, frequencies)
def test_each_undoes_the_other(u: float, f: float) -> None:
    assert jet.drive_frequency(u, jet.drive_wavelength(u, f)) == pytest.approx(f, rel=1e-14)


def test_what_is_refused() -> None:
    for velocity in (0.0, -1.0):  # a jet that stands still carries no wave
        with pytest.raises(Unphysical, match="velocity"):
            jet.drive_frequency(velocity, 450e-6)
    with pytest.raises(Unphysical, match="wavelength"):
        jet.drive_frequency(18.0, 0.0)
    with pytest.raises(Unphysical, match="frequency"):
        jet.drive_wavelength(18.0, 0.0)
    with pytest.raises(UnitError, match="wavelength"):
        jet.drive_frequency("18 m/s", "40 kHz")
