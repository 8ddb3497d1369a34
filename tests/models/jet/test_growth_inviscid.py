"""Rayleigh's inviscid growth: closed values, limits and scaling.

Marks: [C] computed from the closed formula elsewhere to 20 digits and more, which tests the code and
not the physics; [M] from memory; [S] seen in the source named.
"""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy.special import iv

from dropkit.errors import OutOfRange, RangeWarning
from dropkit.models import jet
from dropkit.models.jet._series import bessel_ratio

# rho = gamma = a = 1: the growth rate is then w* = w sqrt(rho a^3/gamma).
UNIT = (1.0, 1.0, 2.0)


@pytest.mark.parametrize(
    ("x_squared", "growth"),
    [
        # [C]; the table that Rayleigh printed in 1878 is remembered as .1536 .2108 .2794 .3182
        # .3432 .2701 [M]
        (0.05, 0.153631991915),
        (0.1, 0.210823899506),
        (0.2, 0.279400163781),
        (0.3, 0.318197617404),
        (0.5, 0.343201165915),
        (0.8, 0.270069998911),
    ],
)
def test_closed_values(x_squared: float, growth: float) -> None:
    wavelength = 2.0 * math.pi / math.sqrt(x_squared)
    assert jet.growth_rate_inviscid(*UNIT, wavelength) == pytest.approx(growth, rel=2e-12)


def test_remembered_table_of_1878() -> None:  # [M], four digits
    x = np.sqrt([0.05, 0.1, 0.2, 0.3, 0.5, 0.8])
    found = jet.growth_rate_inviscid(*UNIT, 2.0 * math.pi / x)
    np.testing.assert_allclose(found, [0.1536, 0.2108, 0.2794, 0.3182, 0.3432, 0.2701], atol=6e-5)


def test_the_maximum() -> None:
    wave = jet.most_unstable_wavelength_inviscid(1.0)
    assert wave == pytest.approx(4.50718432631, rel=1e-11)  # [C]
    # Encyclopaedia Britannica 1911, vol. 5, "Capillary Action", p. 271: 4.508 [S]
    assert wave == pytest.approx(4.508, abs=1e-3)
    assert jet.maximum_growth_inviscid(*UNIT) == pytest.approx(0.343338701861, rel=2e-12)  # [C]
    at_wave = jet.growth_rate_inviscid(*UNIT, 2.0 * wave)
    assert at_wave == pytest.approx(jet.maximum_growth_inviscid(*UNIT), rel=1e-14)


@given(st.floats(0.01, 0.999), st.floats(-3, 3), st.floats(-2, 1), st.floats(-6, -2))
def test_never_above_the_maximum_and_scales(x: float, rho: float, sigma: float, d: float) -> None:
    density, tension, diameter = 10.0**rho * 1e3, 10.0**sigma, 10.0**d
    growth = jet.growth_rate_inviscid(density, tension, diameter, math.pi * diameter / x)
    most = jet.maximum_growth_inviscid(density, tension, diameter)
    assert 0.0 < growth <= most * (1 + 1e-13)
    unit = jet.growth_rate_inviscid(*UNIT, 2.0 * math.pi / x)
    scale = math.sqrt(tension / (density * (0.5 * diameter) ** 3))
    assert growth == pytest.approx(scale * unit, rel=1e-9)


@given(st.floats(1e-6, 1.0))
def test_series_against_another_library(x: float) -> None:
    assert bessel_ratio(x) == pytest.approx(iv(1, x) / iv(0, x), rel=4e-16 * 8)


@given(st.floats(1e-5, 3e-2))
def test_long_waves_grow_as_in_the_long_wave_theory(x: float) -> None:
    # w* -> x/sqrt2 as x -> 0; the next term is -9/16 x^2 of it.
    growth = jet.growth_rate_inviscid(*UNIT, 2.0 * math.pi / x)
    assert growth == pytest.approx(x / math.sqrt(2.0) * (1.0 - 9.0 / 16.0 * x * x), rel=1e-6)


@given(st.floats(1e-6, 1e-2))
def test_growth_vanishes_at_the_cut_off(diameter: float) -> None:
    cut = jet.cut_off_wavelength(diameter)
    assert cut == pytest.approx(math.pi * diameter, rel=1e-15)
    fastest = jet.maximum_growth_inviscid(998.0, 0.072, diameter)
    assert jet.growth_rate_inviscid(998.0, 0.072, diameter, cut) <= 1e-7 * fastest


def test_growth_is_exactly_zero_at_one() -> None:
    assert jet.growth_rate_inviscid(*UNIT, math.pi * 2.0) == 0.0


def test_beyond_the_cut_off_the_policy_rules() -> None:
    waves = np.array([2.0, 4.0, np.nan])
    with pytest.raises(OutOfRange, match=r"1 of 3 .*\[0\] = 1\.5708"):
        jet.growth_rate_inviscid(1.0, 1.0, 1.0, waves)
    silent = jet.growth_rate_inviscid(1.0, 1.0, 1.0, waves, outside="nan")
    assert np.isnan(silent).tolist() == [True, False, True]
    allowed = jet.growth_rate_inviscid(1.0, 1.0, 1.0, waves, outside="allow")
    assert allowed[0] == 0.0
    assert allowed[1] == silent[1]
    with pytest.warns(RangeWarning, match="reduced wavenumber"):
        assert jet.growth_rate_inviscid(1.0, 1.0, 1.0, 2.0, outside="warn") == 0.0
