"""Wavelengths on a jet: the three that get mixed up."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers


@pytest.mark.parametrize(
    ("ratio", "x"),
    [
        (math.pi, 1.0),  # cut-off: a wave as long as the circumference
        (4.50718432631, 0.697018898306),  # inviscid optimum, computed from Rayleigh's relation
        (math.sqrt(2) * math.pi, 1 / math.sqrt(2)),  # long-wave optimum, 4.443
    ],
)
def test_three_wavelengths(ratio: float, x: float) -> None:
    diameter = 50e-6
    wavelength = ratio * diameter
    assert numbers.wavelength_ratio(diameter, wavelength) == pytest.approx(ratio)
    assert numbers.reduced_wavenumber(diameter / 2, wavelength) == pytest.approx(x, rel=1e-9)


def test_rayleighs_printed_wavelength() -> None:
    # Encyclopaedia Britannica 1911, vol. 5, "Capillary Action", p. 271: 4.508 diameters.
    x = numbers.reduced_wavenumber(0.5, 4.508)
    assert x == pytest.approx(0.697, abs=2e-4)


@given(st.floats(1e-6, 1e-2), st.floats(1e-3, 100.0), st.floats(1.0, 1e6))
def test_a_driven_jet(diameter: float, velocity: float, frequency: float) -> None:
    wavelength = velocity / frequency
    ratio = numbers.wavelength_ratio(diameter, wavelength)
    assert ratio == pytest.approx(1 / numbers.strouhal(velocity, diameter, frequency))
    assert ratio == pytest.approx(math.pi / numbers.reduced_wavenumber(diameter / 2, wavelength))


def test_drop_of_one_wavelength() -> None:
    # Project's reference: D/d = (1.5 lambda/d)^(1/3) = 1.73801332244, 1.88988157484 and
    # 2.18975956994 at lambda/d = 3.5, 4.5 and 7.
    for ratio, drop in ((3.5, 1.73801332244), (4.5, 1.88988157484), (7.0, 2.18975956994)):
        found = numbers.wavelength_ratio(60e-6, ratio * 60e-6)
        assert (1.5 * found) ** (1 / 3) == pytest.approx(drop, rel=1e-11)
