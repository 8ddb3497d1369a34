"""Lengths and speeds of balance: where the numbers are 1."""

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


@given(density, viscosity, tension, size)
def test_each_scale_makes_its_number_one(rho: float, mu: float, gamma: float, d: float) -> None:
    assert numbers.bond(rho, gamma, numbers.capillary_length(rho, gamma)) == pytest.approx(1.0)
    natural = numbers.visco_capillary_length(rho, mu, gamma)
    assert numbers.ohnesorge(rho, mu, gamma, natural) == pytest.approx(1.0)
    speed = numbers.inertio_capillary_velocity(rho, gamma, d)
    assert numbers.weber(rho, gamma, speed, d) == pytest.approx(1.0)
    speed = numbers.inertio_capillary_velocity_radius(rho, gamma, d / 2)
    assert numbers.weber_radius(rho, gamma, speed, d / 2) == pytest.approx(1.0)
    speed = numbers.visco_capillary_velocity(mu, gamma)
    assert numbers.capillary(mu, gamma, speed) == pytest.approx(1.0)


@given(density, viscosity, tension, size)
def test_lengths_invert_times(rho: float, mu: float, gamma: float, d: float) -> None:
    time = numbers.inertio_capillary_time(rho, gamma, d)
    assert numbers.inertio_capillary_length(rho, gamma, time) == pytest.approx(d)
    time = numbers.viscous_time(rho, mu, d)
    assert numbers.viscous_length(rho, mu, time) == pytest.approx(d)


def test_check_values() -> None:
    # Project's reference: tip of a water thread of 10 um radius retracts at 2.699651573 m/s
    # (998.2 kg/m3, 72.75 mN/m); the form with the radius as read in Sci. Rep. 9 (2019).
    found = numbers.inertio_capillary_velocity_radius(998.2, 0.07275, 10e-6)
    assert found == pytest.approx(2.699651573, rel=1e-9)
    # Commonly garbled: a sheet retracts at (2 gamma / (rho h))^(1/2), a cylinder is not faster
    # by the same 2.
    sheet = math.sqrt(2) * numbers.inertio_capillary_velocity(998.2, 0.07275, 20e-6)
    assert sheet == pytest.approx(found)
    # Capillary length of water, 2.7 mm, and its visco-capillary length, 14 nm [from memory].
    assert numbers.capillary_length(998.2, 0.0727) == pytest.approx(2.7e-3, rel=0.02)
    assert numbers.visco_capillary_length(998.2, 1.0016e-3, 0.0727) == pytest.approx(
        14e-9, rel=0.03
    )


def test_a_capillary_length_comes_in_millimetres() -> None:
    found = numbers.capillary_length("998.2 kg/m3", "72.7 mN/m")
    assert str(found.units) == "millimeter"
    assert found.magnitude == pytest.approx(2.725, abs=5e-4)
