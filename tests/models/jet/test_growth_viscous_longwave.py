"""Weber's long-wave viscous growth: closed values, limits, and that the formula solves its equation.

Marks: [C] computed from the closed formula elsewhere to 20 digits and more; it tests the code.
"""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import OutOfRange
from dropkit.models import jet

# rho = gamma = a = 1: the viscosity is then the Ohnesorge number on the radius.


@pytest.mark.parametrize(
    ("ohnesorge_radius", "x_most", "growth", "wavelength"),
    [  # [C]
        (0.01, 0.699724034501, 0.346209184726, 8.97951906377),
        (0.1, 0.642258761786, 0.29167894303, 9.7829499277),
        (10.0, 0.150030447673, 0.015916362159, 41.8794011791),
    ],
)
def test_closed_values(
    ohnesorge_radius: float, x_most: float, growth: float, wavelength: float
) -> None:
    liquid = (1.0, ohnesorge_radius, 1.0, 2.0)
    wave = jet.most_unstable_wavelength_viscous_longwave(*liquid)
    assert wave == pytest.approx(wavelength, rel=1e-11)
    assert 2.0 * math.pi / wave == pytest.approx(x_most, rel=1e-11)
    assert jet.maximum_growth_viscous_longwave(*liquid) == pytest.approx(growth, rel=1e-10)
    assert jet.growth_rate_viscous_longwave(*liquid, wave) == pytest.approx(growth, rel=1e-10)


@pytest.mark.parametrize(
    ("ohnesorge_radius", "x", "full_relation", "percent"),
    [
        # Roots of the full Rayleigh-Chandrasekhar relation [C]: what the long-wave form costs.
        (0.01, 0.68961045, 0.336346301575, 2.93),
        (0.1, 0.63496844, 0.285463696728, 2.2),
        (1.0, 0.39938, 0.112889401966, 0.3),
        (10.0, 0.15001399, 0.0159152981366, 0.01),
    ],
)
def test_distance_from_the_full_relation_at_its_maximum(
    ohnesorge_radius: float, x: float, full_relation: float, percent: float
) -> None:
    most = jet.maximum_growth_viscous_longwave(1.0, ohnesorge_radius, 1.0, 2.0)
    assert 100.0 * (most / full_relation - 1.0) == pytest.approx(percent, abs=0.05)
    there = jet.growth_rate_viscous_longwave(1.0, ohnesorge_radius, 1.0, 2.0, 2.0 * math.pi / x)
    assert there == pytest.approx(most, rel=1e-3)


def test_thin_liquid_is_the_one_dimensional_inviscid_limit() -> None:
    # x = 1/sqrt2, w* = 1/sqrt8 [C]
    thin = (1.0, 1e-12, 1.0, 2.0)
    assert jet.maximum_growth_viscous_longwave(*thin) == pytest.approx(0.353553390593, rel=1e-11)
    wave = jet.most_unstable_wavelength_viscous_longwave(*thin)
    assert wave == pytest.approx(math.sqrt(2.0) * math.pi * 2.0, rel=1e-11)


@given(st.floats(-9, 9), st.floats(0.001, 0.999))
def test_solves_its_own_equation(power: float, x: float) -> None:
    oh = 10.0**power
    w = jet.growth_rate_viscous_longwave(1.0, oh, 1.0, 2.0, 2.0 * math.pi / x)
    drive = 0.5 * x * x * (1.0 - x * x)
    assert w * w + 3.0 * oh * x * x * w == pytest.approx(drive, rel=1e-12)
    assert 0.0 < w <= jet.maximum_growth_viscous_longwave(1.0, oh, 1.0, 2.0) * (1 + 1e-12)


@given(st.floats(0.05, 0.99), st.floats(-6, 4), st.floats(1.01, 100))
def test_more_viscosity_never_speeds_growth_and_never_shortens_the_wave(
    x: float, power: float, factor: float
) -> None:
    thin, thick = 10.0**power, factor * 10.0**power
    wave = 2.0 * math.pi / x
    assert jet.growth_rate_viscous_longwave(
        1.0, thick, 1.0, 2.0, wave
    ) < jet.growth_rate_viscous_longwave(1.0, thin, 1.0, 2.0, wave)
    longest = jet.most_unstable_wavelength_viscous_longwave
    assert longest(1.0, thick, 1.0, 2.0) > longest(1.0, thin, 1.0, 2.0)


@given(st.floats(1e-3, 0.15))
def test_long_waves_grow_as_rayleigh_says_where_viscosity_is_nothing(x: float) -> None:
    wave = 2.0 * math.pi / x
    viscous = jet.growth_rate_viscous_longwave(1.0, 1e-12, 1.0, 2.0, wave)
    # Long-wave and exact form part by x^2/16 of themselves.
    expected = jet.growth_rate_inviscid(1.0, 1.0, 2.0, wave) * (1.0 + x * x / 16.0)
    assert viscous == pytest.approx(expected, rel=2e-5)


def test_both_length_scales_of_the_ohnesorge_number() -> None:
    density, viscosity, tension, d = 1130.0, 0.02, 0.06, 80e-6
    on_radius = viscosity / math.sqrt(density * tension * 0.5 * d)
    expected = math.pi * d * math.sqrt(2.0 + 3.0 * math.sqrt(2.0) * on_radius)
    found = jet.most_unstable_wavelength_viscous_longwave(density, viscosity, tension, d)
    assert found == pytest.approx(expected, rel=1e-14)


def test_beyond_the_cut_off_waves_decay() -> None:
    liquid = (1.0, np.array([0.01, 3.0]), 1.0, 2.0)
    with pytest.raises(OutOfRange, match="2 of 2"):
        jet.growth_rate_viscous_longwave(*liquid, np.array([5.0, 5.0]))
    decay = jet.growth_rate_viscous_longwave(*liquid, 5.0, outside="allow")
    x = 2.0 * math.pi / 5.0
    # The thin liquid oscillates, so only the damping is left; the thick one creeps back.
    assert decay[0] == pytest.approx(-1.5 * 0.01 * x * x, rel=1e-12)
    assert decay[1] ** 2 + 9.0 * x * x * decay[1] == pytest.approx(0.5 * x * x * (1 - x * x))
    assert decay[1] < 0.0
