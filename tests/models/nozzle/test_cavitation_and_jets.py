"""Cavitation, shear, lengths and the jet that comes out: values by hand, limits, quadrature."""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy.special import jn_zeros

from dropkit.errors import OutOfRange, UnitError
from dropkit.models import nozzle

WATER = (998.2, 1.0e-3)


# --- cavitation ------------------------------------------------------------------------------


def test_cavitation_parameter_by_hand() -> None:
    # (101.325 + 300 - 2.34)/300.
    assert nozzle.cavitation_parameter(2340.0, 3e5) == pytest.approx(398985.0 / 3e5, rel=1e-14)
    higher = nozzle.cavitation_parameter(2340.0, 3e5, ambient_pressure=3e5)
    assert higher == pytest.approx(597660.0 / 3e5, rel=1e-14)
    with pytest.raises(UnitError, match="gauge"):
        nozzle.cavitation_parameter(2340.0, "3 bara")
    # A liquid that boils in the surroundings is at 1 or below.
    assert nozzle.cavitation_parameter(101325.0, 3e5) == pytest.approx(1.0, rel=1e-14)


def test_inception_and_flip_by_hand() -> None:
    # Re = 1e-3 sqrt(2 x 1000 x 5e5)/1e-3 = 31622.7766.
    reynolds = math.sqrt(1e9)
    liquid = (1000.0, 1e-3, 5e5, 1e-3)
    sharp = nozzle.cavitation_inception_parameter(*liquid)
    assert sharp == pytest.approx(1.9 - 1000.0 / reynolds, rel=1e-14)
    rounded = nozzle.cavitation_inception_parameter(*liquid, edge_radius=1e-4)
    assert rounded == pytest.approx(1.9 * 0.81 - 1000.0 / reynolds, rel=1e-13)
    flip = nozzle.hydraulic_flip_parameter(*liquid, 4e-3)
    assert flip == pytest.approx(1.0 + 1.0 / (2.0 * (1.0 + 2000.0 / reynolds)), rel=1e-14)
    assert nozzle.hydraulic_flip_parameter(*liquid, 4e-3, edge_radius=1e-4) < flip
    with pytest.raises(OutOfRange, match="edge"):
        nozzle.cavitation_inception_parameter(*liquid, edge_radius=2e-4)


@given(st.floats(1.12e5, 4e6), st.floats(1e3, 1e5))
def test_a_cavitating_hole_does_not_feel_what_is_behind_it(pressure: float, vapour: float) -> None:
    # Q ~ Cd sqrt(p1 - p2) = Cc sqrt(p1 - pv): raising the surroundings at the same p1 changes nothing.
    flows = []
    for ambient in (1.0e5, 1.1e5):
        gauge = pressure + 1.0e5 - ambient
        cd = nozzle.discharge_coefficient_cavitating(
            vapour, gauge, 1e-3, ambient_pressure=ambient, outside="allow"
        )
        flows.append(cd * math.sqrt(gauge))
    assert flows[0] == pytest.approx(flows[1], rel=1e-12)


def test_cavitating_coefficient() -> None:
    got = nozzle.discharge_coefficient_cavitating(2340.0, 3e5, 1e-3)
    assert got == pytest.approx(0.611 * math.sqrt(398985.0 / 3e5), rel=1e-14)
    # Rounding widens the jet: 1/0.611^2 - 11.4 x 0.05 = 2.1087.
    edge = nozzle.discharge_coefficient_cavitating(2340.0, 3e5, 1e-3, edge_radius=5e-5)
    assert edge / got == pytest.approx(math.sqrt(0.611**-2 / (0.611**-2 - 0.57)), rel=1e-13)
    with pytest.raises(OutOfRange, match="cavitation parameter"):
        nozzle.discharge_coefficient_cavitating(2340.0, 1e4, 1e-3)
    most = nozzle.discharge_coefficient_cavitating(
        2340.0, np.array([3e5, 3e5]), 1e-3, edge_radius=np.array([0.0, 3e-4]), outside="allow"
    )
    assert most[1] == pytest.approx(math.sqrt(398985.0 / 3e5), rel=1e-14)


# --- contraction -----------------------------------------------------------------------------


def test_wide_pipe() -> None:
    # pi/(pi + 2) = 0.6110154704 [C].
    got = nozzle.contraction_coefficient_orifice(1e-6, 1.0)
    assert got == pytest.approx(0.6110154704, rel=1e-6)


@given(st.floats(0.01, 0.99))
def test_the_quoted_equation_holds(beta: float) -> None:
    cc = nozzle.contraction_coefficient_orifice(beta, 1.0)
    assert 0.611 <= cc < 1.0
    s = cc * beta
    assert cc * (1.0 + 2.0 / math.pi * (1.0 / s - s) * math.atan(s)) == pytest.approx(1.0, rel=1e-9)


def test_contraction_grows_with_the_hole_and_ends_at_one() -> None:
    beta = np.linspace(0.01, 0.9999, 200)
    found = nozzle.contraction_coefficient_orifice(beta, 1.0)
    assert (np.diff(found) > 0.0).all()
    assert found[-1] == pytest.approx(1.0, abs=0.02)
    with pytest.raises(OutOfRange, match="pipe"):
        nozzle.contraction_coefficient_orifice(2e-3, 1e-3)
    kept = nozzle.contraction_coefficient_orifice(np.array([5e-4, 2e-3]), 1e-3, outside="nan")
    assert np.isnan(kept).tolist() == [False, True]
    assert math.isnan(nozzle.contraction_coefficient_orifice(2e-3, 1e-3, outside="nan"))


# --- shear, lengths, speeds ------------------------------------------------------------------


@given(st.floats(0.1, 2.0), st.floats(0.01, 50.0), st.floats(1e-5, 1e-2))
def test_wall_shear_rate_is_the_slope_of_the_profile(n: float, u: float, d: float) -> None:
    # u(r) = U (3n + 1)/(n + 1) (1 - (r/a)^((n + 1)/n)); its slope at the wall, here by difference.
    step = 1e-6
    outer = u * (3.0 * n + 1.0) / (n + 1.0) * -math.expm1((n + 1.0) / n * math.log1p(-step))
    got = nozzle.wall_shear_rate(u, d, flow_index=n)
    assert got == pytest.approx(outer / (step * 0.5 * d), rel=2e-5)
    assert nozzle.wall_shear_rate(u, d) == pytest.approx(8.0 * u / d, rel=1e-14)


def test_lengths_and_speeds_by_hand() -> None:
    assert nozzle.entrance_length_laminar(1000.0, 1e-3, 1.0, 1e-3) == pytest.approx(0.06, rel=1e-14)
    # 4.4 x 64000^(1/6) = 4.4 x 6.32456.
    got = nozzle.entrance_length_turbulent(1000.0, 1e-3, 64.0, 1e-3)
    assert got == pytest.approx(4.4e-3 * 40.0**0.5, rel=1e-12)
    with pytest.raises(OutOfRange):
        nozzle.entrance_length_laminar(1000.0, 1e-3, 3.0, 1e-3)
    with pytest.raises(OutOfRange):
        nozzle.entrance_length_turbulent(1000.0, 1e-3, 3.0, 1e-3)
    found = nozzle.transition_velocity(1000.0, 1e-3, 1e-3)
    assert tuple(found) == pytest.approx((2.1, 4.0), rel=1e-14)


def test_profile_relaxation_against_diffusion_of_a_parabola() -> None:
    # du/dt = nu (u'' + u'/r), no slope at r = 1, nu = 1, u = 1 - r^2; conservative differences.
    n, dt = 100, 4e-5
    r = (np.arange(n) + 0.5) / n
    face = np.arange(1, n) / n
    u = 1.0 - r * r
    first = np.ptp(u)
    deviation = []
    for _ in range(int(0.5 / dt)):
        flux = face * np.diff(u) * n
        change = np.zeros(n)
        change[:-1] += flux
        change[1:] -= flux
        u = u + dt * n * change / r
        deviation.append(np.ptp(u) / first)
    times = dt * np.arange(1, len(deviation) + 1)
    # The rate at which the slowest mode dies, and the time to 1 % (the parabola is almost that mode).
    late = (times > 0.2) & (times < 0.4)
    rate = -np.polyfit(times[late], np.log(np.array(deviation)[late]), 1)[0]
    assert rate == pytest.approx(jn_zeros(1, 1)[0] ** 2, rel=0.01)
    to_percent = times[np.searchsorted(-np.array(deviation), -0.01)]
    # L = U t with t = to_percent a^2/nu: L/(d Re) = to_percent/4.
    length = nozzle.profile_relaxation_length(1000.0, 1e-3, 1.0, 1e-3)
    assert length / (1e-3 * 1000.0) == pytest.approx(to_percent / 4.0, rel=0.05)


@given(st.floats(1e-6, 0.9))
def test_profile_relaxation_takes_equal_lengths_for_equal_factors(share: float) -> None:
    one = nozzle.profile_relaxation_length(*WATER, 5.0, 1e-4, remaining=share)
    two = nozzle.profile_relaxation_length(*WATER, 5.0, 1e-4, remaining=share**2)
    assert two == pytest.approx(2.0 * one, rel=1e-12)


# --- the jet that comes out ------------------------------------------------------------------


def test_swell_and_contraction_of_a_laminar_jet() -> None:
    # Marks from memory [M]: 1.13 towards 0, 1 near 15, sqrt(3)/2 above 100 to 150.
    reynolds = np.array([1e-3, 15.0, 150.0, 2000.0])
    found = nozzle.jet_diameter_laminar_tube(1000.0, 1e-3, reynolds, 1e-6)
    assert found.diameter[0] == pytest.approx(1.13e-6, rel=1e-4)
    assert found.diameter[1] == pytest.approx(1e-6, rel=0.005)
    assert found.diameter[2] == pytest.approx(0.8660254e-6, rel=0.011)
    assert found.diameter[3] == pytest.approx(0.8660254e-6, rel=0.0005)
    assert (np.diff(found.diameter) < 0.0).all()
    assert (found.low < found.diameter).all()
    assert (found.diameter < found.high).all()
    with pytest.raises(OutOfRange):
        nozzle.jet_diameter_laminar_tube(1000.0, 1e-3, 5.0, 1e-3)


def test_jet_from_a_sharp_orifice() -> None:
    found = nozzle.jet_diameter_sharp_orifice(*WATER, 15.0, 3e-4)
    assert [part / 3e-4 for part in found] == pytest.approx([0.62**0.5, 0.61**0.5, 0.8], rel=1e-12)
    with pytest.raises(OutOfRange, match="Reynolds number"):
        nozzle.jet_diameter_sharp_orifice(*WATER, 1.0, 3e-4)
