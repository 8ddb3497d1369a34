"""Times of balance: check values of drops that oscillate and threads that thin."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers

density = st.floats(500.0, 2e4)
viscosity = st.floats(1e-4, 10.0)
tension = st.floats(0.005, 2.0)
size = st.floats(1e-6, 1e-2)


def test_oscillation_of_a_water_drop() -> None:
    # Rayleigh 1879, omega_2^2 = 8 gamma / (rho a^3); project's reference: 121.5270179 Hz for
    # 998.2 kg/m3, 72.75 mN/m, a = 1 mm.
    time = numbers.inertio_capillary_time_radius(998.2, 0.07275, 1e-3)
    assert math.sqrt(8) / (2 * math.pi * time) == pytest.approx(121.5270179, rel=1e-9)


def test_fastest_wave_of_a_jet() -> None:
    # Growth rates are in units of the time on the radius: 0.343338701861 for the inviscid optimum
    # (computed from Rayleigh's relation). On the diameter the same rate is 0.9711.
    a, rho, gamma = 25e-6, 998.2, 0.0727
    rate = 0.343338701861 / numbers.inertio_capillary_time_radius(rho, gamma, a)
    on_diameter = rate * numbers.inertio_capillary_time(rho, gamma, 2 * a)
    assert on_diameter == pytest.approx(0.343338701861 * math.sqrt(8))


def test_thinning_of_a_newtonian_thread() -> None:
    # D = 0.1418 (gamma / mu) (t_c - t), R = 0.0709 (...), as quoted in the project's reference:
    # time to pinch from d is d / 0.1418 in visco-capillary times.
    mu, gamma, d = 1.0, 0.03, 1e-3
    pinch = d / (0.1418 * gamma / mu)
    assert pinch / numbers.visco_capillary_time(mu, gamma, d) == pytest.approx(1 / 0.1418)
    on_radius = pinch / numbers.visco_capillary_time_radius(mu, gamma, d / 2)
    assert on_radius == pytest.approx(1 / 0.0709, rel=1e-9)


@given(density, viscosity, tension, size)
def test_relations(rho: float, mu: float, gamma: float, d: float) -> None:
    a = d / 2
    inertial = numbers.inertio_capillary_time(rho, gamma, d)
    viscous = numbers.viscous_time(rho, mu, d)
    pinching = numbers.visco_capillary_time(mu, gamma, d)
    oh = numbers.ohnesorge(rho, mu, gamma, d)
    assert pinching / inertial == pytest.approx(oh)
    assert inertial / viscous == pytest.approx(oh)
    assert inertial**2 == pytest.approx(viscous * pinching)
    assert inertial == pytest.approx(
        math.sqrt(8) * numbers.inertio_capillary_time_radius(rho, gamma, a)
    )
    assert viscous == pytest.approx(4 * numbers.viscous_time_radius(rho, mu, a))
    assert pinching == pytest.approx(2 * numbers.visco_capillary_time_radius(mu, gamma, a))
    falling = numbers.capillary_time(rho, gamma)
    assert falling**2 * 9.80665 == pytest.approx(numbers.capillary_length(rho, gamma))


@given(density, viscosity, tension)
def test_all_times_meet_at_the_visco_capillary_length(rho: float, mu: float, gamma: float) -> None:
    natural = numbers.visco_capillary_length(rho, mu, gamma)
    expected = mu**3 / (rho * gamma**2)
    assert numbers.visco_capillary_time(mu, gamma, natural) == pytest.approx(expected)
    assert numbers.inertio_capillary_time(rho, gamma, natural) == pytest.approx(expected)
    assert numbers.viscous_time(rho, mu, natural) == pytest.approx(expected)


def test_times_come_in_microseconds() -> None:
    found = numbers.inertio_capillary_time(1000.0, "64 mN/m", "40 um")
    assert str(found.units) == "microsecond"
    assert found.magnitude == pytest.approx(31.6227766)
