"""A thread in a second liquid: the 4x4 Stokes problem in 30 digits, closed values, both limits.

Marks: [C] computed elsewhere to 20 digits and more; [M+] remembered, and it agrees with [C].
"""

from __future__ import annotations

import math
from typing import Any

import mpmath as mp
import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy.special import iv, kv

from dropkit.errors import OutOfRange
from dropkit.models import jet

# gamma = a = outer viscosity = 1: the viscosity is then the ratio p.


def growth(x: Any, p: Any, **options: Any) -> Any:
    return jet.growth_rate_thread_in_liquid(p, 1.0, 1.0, 2.0, 2.0 * math.pi / x, **options)


def four_conditions(x: float, p: float) -> float:
    """Growth rate from the constants A, B inside and C, D outside: psi/r = A I1 + B x I0, and K."""
    with mp.workdps(40):
        z, ratio = mp.mpf(x), mp.mpf(p)
        i0, i1, k0, k1 = mp.besseli(0, z), mp.besseli(1, z), mp.besselk(0, z), mp.besselk(1, z)
        i2, k2 = i0 - i1 / z, -k0 - k1 / z  # derivatives of I1 and K1
        rows = [
            [i1, z * i0, -k1, -z * k0],  # radial velocity
            [i0, 2 * i0 + z * i1, k0, z * k1 - 2 * k0],  # axial velocity
            [ratio * i1, ratio * (z * i0 + i1), -k1, k1 - z * k0],  # shear stress
            [ratio * i2, ratio * z * i1, -k2, z * k1],  # normal stress
        ]
        found = mp.lu_solve(mp.matrix(rows), mp.matrix([0, 0, 0, (1 - z * z) / (2 * z * z)]))
        return float(z * (found[0] * i1 + found[1] * z * i0))


@pytest.mark.parametrize(
    ("p", "x", "most"), [(0.01, 0.413436, 0.26648580), (100.0, 0.237209, 0.00144173)]
)
def test_closed_maxima(p: float, x: float, most: float) -> None:  # [C]
    wave = jet.most_unstable_wavelength_thread_in_liquid(p, 1.0, 2.0)
    assert 2.0 * math.pi / wave == pytest.approx(x, abs=6e-7)
    found = jet.maximum_growth_thread_in_liquid(p, 1.0, 1.0, 2.0)
    assert found == pytest.approx(most, abs=6e-9)


def test_the_shortest_fastest_wave() -> None:
    # 0.590035 at 0.2839 [C]; Tomotika found 0.589 at 0.28 [M+].
    p = np.geomspace(0.2, 0.4, 2001)
    x = 2.0 * math.pi / jet.most_unstable_wavelength_thread_in_liquid(p, 1.0, 2.0)
    assert x.max() == pytest.approx(0.590035, abs=1e-6)
    assert p[x.argmax()] == pytest.approx(0.2839, abs=5e-4)
    assert x.max() == pytest.approx(0.589, abs=0.002)


POINTS = np.random.default_rng(4).uniform([-3.0, -8.0], [-1e-4, 8.0], (40, 2))


@pytest.mark.parametrize(("place", "power"), POINTS.tolist())
def test_the_four_conditions_in_forty_digits(place: float, power: float) -> None:
    x, p = 10.0**place, 10.0**power
    assert growth(x, p) == pytest.approx(four_conditions(x, p), rel=4e-15)


@given(st.floats(0.01, 0.999))
def test_both_limits(x: float) -> None:
    thread = (1 - x * x) / (2 * (x * x * (iv(0, x) / iv(1, x)) ** 2 - 1 - x * x))
    hollow = (1 - x * x) / (2 * (1 + x * x - x * x * (kv(0, x) / kv(1, x)) ** 2))
    assert 1e14 * growth(x, 1e14) == pytest.approx(thread, rel=1e-8)
    assert growth(x, 1e-14) == pytest.approx(hollow, rel=1e-8)
    assert 1e8 * growth(x, 1e8) == pytest.approx(
        1e12 * jet.reduced_growth_viscous_full(x, 1e12), rel=1e-2
    )


@given(st.floats(0.01, 0.999), st.floats(-6, 6), st.floats(1.01, 10))
def test_either_liquid_thicker_is_slower(x: float, power: float, factor: float) -> None:
    wave, p = 2.0 * math.pi / x, 10.0**power
    here = jet.growth_rate_thread_in_liquid(p, 1.0, 1.0, 2.0, wave)
    assert jet.growth_rate_thread_in_liquid(factor * p, 1.0, 1.0, 2.0, wave) < here
    assert jet.growth_rate_thread_in_liquid(p, factor, 1.0, 2.0, wave) < here


@given(st.floats(-25, 25))
def test_the_maximum_is_one(power: float) -> None:
    p = 10.0**power
    most = jet.maximum_growth_thread_in_liquid(p, 1.0, 1.0, 2.0)
    x = 2.0 * math.pi / jet.most_unstable_wavelength_thread_in_liquid(p, 1.0, 2.0)
    assert growth(x, p) == pytest.approx(most, rel=1e-13)
    for near in (0.99, 1.01):
        assert growth(near * x, p) <= most * (1 + 1e-14)


@given(st.floats(-8, 8), st.floats(0.05, 0.99))
def test_growth_at_the_ends_of_the_band(power: float, share: float) -> None:
    p = 10.0**power
    most = jet.maximum_growth_thread_in_liquid(p, 1.0, 1.0, 2.0)
    band = jet.growth_band_thread_in_liquid(p, 1.0, 2.0, share=share)
    fastest = jet.most_unstable_wavelength_thread_in_liquid(p, 1.0, 2.0)
    assert band.shortest < fastest < band.longest
    for wave in band:
        assert growth(2.0 * math.pi / wave, p) == pytest.approx(share * most, rel=1e-11)


@given(st.floats(-3, 3), st.floats(-3, 3), st.floats(-3, 0), st.floats(-6, -2))
def test_scaling(inner: float, outer: float, tension: float, diameter: float) -> None:
    mu, mu_o, gamma, d = (10.0**power for power in (inner, outer, tension, diameter))
    found = jet.maximum_growth_thread_in_liquid(mu, mu_o, gamma, d)
    unit = jet.maximum_growth_thread_in_liquid(mu / mu_o, 1.0, 1.0, 2.0)
    assert found == pytest.approx(unit * 2.0 * gamma / (mu_o * d), rel=1e-12)


def test_the_cut_off_and_beyond() -> None:
    assert growth(1.0, np.array([1e-9, 1.0, 1e9])).tolist() == [0.0, 0.0, 0.0]
    with pytest.raises(OutOfRange, match="reduced wavenumber"):
        growth(1.2, 1.0)
    decay = growth(np.array([0.9, 1.2, 4.0]), 1.0, outside="allow")
    assert decay[0] > 0.0 > decay[1] > decay[2]
    assert decay[2] == pytest.approx(four_conditions(4.0, 1.0), rel=1e-12)
