"""Waves along a jet from a source of one frequency: they solve the relation, and which root it is."""

from __future__ import annotations

import math
from typing import Any

import mpmath as mp
import numpy as np
import pytest
from hypothesis import assume, given
from hypothesis import strategies as st

from dropkit.errors import OutOfRange
from dropkit.models import jet

# rho = gamma = a = 1: the speed is the root of the Weber number on the radius, the viscosity the
# Ohnesorge number on the radius, and omega = 2 pi f a/U.
ohnesorges = st.floats(-4, 2).map(lambda power: 10.0**power)
omegas = st.floats(0.01, 0.999)


def frequency(omega: Any, speed: Any) -> Any:
    return omega * speed / (2.0 * math.pi)


def viscous(omega: Any, oh: Any, speed: Any, **options: Any) -> Any:
    return jet.spatial_growth_viscous(1.0, oh, 1.0, speed, 2.0, frequency(omega, speed), **options)


def inviscid(omega: Any, speed: Any, **options: Any) -> Any:
    return jet.spatial_growth_inviscid(1.0, 1.0, speed, 2.0, frequency(omega, speed), **options)


def complex_wavenumber(wave: Any) -> Any:
    return mp.mpc(2.0 * math.pi / wave.wavelength, -wave.growth_per_length)


def threshold(oh: float) -> float:
    return jet.absolute_instability_velocity_viscous(1.0, oh, 1.0, 2.0)


def mismatch(x: Any, oh: Any, w: Any) -> tuple[Any, Any]:
    """Both sides of the relation as first printed."""
    y = mp.sqrt(x * x + w / oh)
    i0, i1, j0, j1 = mp.besseli(0, x), mp.besseli(1, x), mp.besseli(0, y), mp.besseli(1, y)
    bracket = (i0 - i1 / x) - (2 * x * y / (x * x + y * y)) * (i1 / j1) * (j0 - j1 / y)
    left = w * w + 2 * oh * x * x / i0 * bracket * w
    return left, x * (1 - x * x) * (i1 / i0) * (y * y - x * x) / (y * y + x * x)


@given(omegas, ohnesorges, st.floats(1.01, 100.0))
def test_the_viscous_wave_solves_the_printed_relation(
    omega: float, oh: float, factor: float
) -> None:
    speed = factor * threshold(oh)
    x = complex_wavenumber(viscous(omega, oh, speed))
    with mp.workdps(30):
        w = 1j * speed * (x - omega)
        left, right = mismatch(x, mp.mpf(oh), w)
        # Differences w = i v (x - omega) of nearly equal numbers cost digits of x only.
        scale = abs(w) ** 2 + abs(right) + speed * abs(x) * abs(w)
        assert abs(left - right) < 1e-11 * scale


@given(omegas, st.floats(1.001, 1000.0))
def test_the_inviscid_wave_solves_rayleighs_relation(omega: float, factor: float) -> None:
    speed = factor * math.sqrt(3.12255029)
    assume(omega < 1.0 - 0.3 / speed**2)  # growth ends a little below 1
    x = complex_wavenumber(inviscid(omega, speed))
    w = 1j * speed * (x - omega)
    right = x * (1 - x * x) * mp.besseli(1, x) / mp.besseli(0, x)
    assert abs(w * w - right) < 1e-11 * (abs(right) + speed * abs(x) * abs(w))
    assert x.imag < 0.0


@given(omegas, ohnesorges)
def test_a_fast_jet_carries_temporal_growth_along(omega: float, oh: float) -> None:
    wave = viscous(omega, oh, 1e5)
    temporal = jet.reduced_growth_viscous_full(omega, oh)
    # Towards the cut-off growth falls to nothing, and a shift of the wave by 1/We counts for more.
    near = 1e-6 + 1e-8 / (1.0 - omega)
    assert wave.growth_per_length * 1e5 == pytest.approx(temporal, rel=near, abs=1e-9)
    assert 2.0 * math.pi / wave.wavelength == pytest.approx(omega, rel=1e-6)


def test_the_difference_from_temporal_growth_at_rayleighs_wave() -> None:
    x = 0.697018898306  # [C]
    for weber, more in ((5.0, 0.104), (46.0, 0.010), (1000.0, 0.000458)):
        speed = math.sqrt(weber)
        ratio = inviscid(x, speed).growth_per_length * speed / 0.343338701861
        assert ratio - 1.0 == pytest.approx(more, rel=0.03)


@pytest.mark.parametrize("oh", [0.003, 0.05, 0.4, 5.0])
def test_the_root_is_the_same_from_a_fast_jet_down_to_the_threshold(oh: float) -> None:
    """In fine steps of the speed, the wave of one step is the nearest of the next: no other root."""
    omega = np.linspace(0.05, 0.95, 10)
    speeds = threshold(oh) * np.geomspace(1.02, 50.0, 400)[:, None]
    wave = viscous(omega, oh, speeds)
    x = 2.0 * math.pi / wave.wavelength - 1j * wave.growth_per_length
    assert (wave.growth_per_length > 0.0).all()
    steps = np.abs(np.diff(x, axis=0)) / np.abs(x[1:])
    assert steps.max() < 0.05


@given(omegas, st.floats(1.2, 20.0))
def test_little_viscosity_leads_to_the_inviscid_wave(omega: float, factor: float) -> None:
    speed = factor * math.sqrt(3.12255029)
    assume(omega < 1.0 - 0.5 / speed**2)
    thin, none = viscous(omega, 1e-10, speed), inviscid(omega, speed)
    assert thin.growth_per_length == pytest.approx(none.growth_per_length, rel=1e-6)
    assert thin.wavelength == pytest.approx(none.wavelength, rel=1e-6)


@pytest.mark.parametrize("factor", [1.01, 1.1, 1.5, 3.0, 10.0, 30.0])
def test_inviscid_growth_ends_where_two_waves_become_one(factor: float) -> None:
    speed = factor * math.sqrt(3.12255029)

    def pull(x: Any) -> Any:
        return mp.sqrt((x * x - 1) * x * mp.besseli(1, x) / mp.besseli(0, x))

    # Both real waves have w = i pull(x); they meet where its slope is the speed.
    ends = (1 + 1e-5, 1.28108)
    x = mp.findroot(lambda z: mp.diff(pull, z) / speed - 1, ends, solver="illinois", tol=1e-24)
    last = float(x - pull(x) / speed)
    below, near = inviscid(last * (1 - 1e-3), speed), inviscid(last * (1 - 1e-6), speed)
    assert 0.0 < near.growth_per_length < 0.1 * below.growth_per_length
    assert near.wavelength == pytest.approx(2.0 * math.pi / float(x), rel=1e-2)
    with pytest.raises(OutOfRange, match="frequency over the highest"):
        inviscid(last * (1 + 1e-6), speed)


def test_viscous_growth_ends_at_the_cut_off() -> None:
    found = viscous(1.0, np.array([1e-3, 0.1, 10.0]), 5.0)
    np.testing.assert_allclose(found.growth_per_length, 0.0, atol=1e-12)
    np.testing.assert_allclose(found.wavelength, 2.0 * math.pi, rtol=1e-12)
    with pytest.raises(OutOfRange, match="reduced frequency"):
        viscous(1.01, 0.1, 5.0)


def test_below_the_threshold_there_is_no_such_wave() -> None:
    with pytest.raises(OutOfRange, match="Weber number of the liquid on the jet radius"):
        inviscid(0.6, 1.76)
    with pytest.raises(OutOfRange, match="waves grow in place"):
        viscous(0.6, 0.1, 0.999 * threshold(0.1))
    oh = np.array([0.1, 0.1])
    speeds = threshold(0.1) * np.array([0.9, 1.1])
    found = viscous(0.6, oh, speeds, outside="nan")
    assert np.isnan(found.growth_per_length).tolist() == [True, False]
    assert np.isnan(found.wavelength).tolist() == [True, False]


@given(ohnesorges, st.floats(1.1, 10.0), st.floats(-3, 0), st.floats(-6, -2))
def test_scaling(oh: float, factor: float, sigma: float, diameter: float) -> None:
    tension, d, density = 10.0**sigma, 10.0**diameter, 1000.0
    radius = 0.5 * d
    viscosity = oh * math.sqrt(density * tension * radius)
    unit = math.sqrt(tension / (density * radius))
    speed = factor * threshold(oh)
    found = jet.spatial_growth_viscous(
        density, viscosity, tension, speed * unit, d, frequency(0.6, speed) * unit / radius
    )
    plain = viscous(0.6, oh, speed)
    assert found.growth_per_length * radius == pytest.approx(plain.growth_per_length, rel=1e-8)
    assert found.wavelength / radius == pytest.approx(plain.wavelength, rel=1e-8)


def test_arrays_give_what_floats_give() -> None:
    omega, speed = np.linspace(0.1, 0.9, 5), np.array([[2.0], [30.0]])
    found = viscous(omega, 0.05, speed)
    assert found.wavelength.shape == (2, 5)
    one = viscous(float(omega[3]), 0.05, 2.0)
    assert found.growth_per_length[0, 3] == pytest.approx(one.growth_per_length, rel=1e-12)
    assert found.wavelength[0, 3] == pytest.approx(one.wavelength, rel=1e-12)
