"""Ohnesorge, Z, Laplace and capillary numbers: check values, identities, length scales."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers

density = st.floats(500.0, 2e4)
viscosity = st.floats(1e-4, 10.0)
surface_tension = st.floats(0.005, 2.0)
size = st.floats(1e-6, 1e-2)
speed = st.floats(1e-3, 100.0)


def test_check_values() -> None:
    # Computed in the project's reference for a 25 um nozzle.
    assert numbers.ohnesorge(1000.0, 0.010, 0.030, 25e-6) == pytest.approx(0.3651483717, rel=1e-9)
    assert numbers.z_number(1000.0, 0.010, 0.030, 25e-6) == pytest.approx(2.738612788, rel=1e-9)
    # Documentation of the open-source library fluids 1.3.1 (its Suratman number is our Laplace).
    assert numbers.ohnesorge(1000.0, 1e-3, 1e-1, 1e-4) == pytest.approx(0.01)
    assert numbers.laplace(1000.0, 1e-3, 1e-1, 1e-4) == pytest.approx(10000.0)
    assert numbers.capillary(0.01, 0.1, 1.2) == pytest.approx(0.12)


@given(density, viscosity, surface_tension, speed, size)
def test_identities_hold_on_the_diameter_and_on_the_radius(
    rho: float, mu: float, gamma: float, u: float, d: float
) -> None:
    a = d / 2
    oh, oh_a = numbers.ohnesorge(rho, mu, gamma, d), numbers.ohnesorge_radius(rho, mu, gamma, a)
    we, we_a = numbers.weber(rho, gamma, u, d), numbers.weber_radius(rho, gamma, u, a)
    re, re_a = numbers.reynolds(rho, mu, u, d), numbers.reynolds_radius(rho, mu, u, a)
    assert oh == pytest.approx(math.sqrt(we) / re)
    assert oh_a == pytest.approx(math.sqrt(we_a) / re_a)
    assert oh == pytest.approx(oh_a / math.sqrt(2))
    assert re == pytest.approx(2 * re_a)
    assert numbers.capillary(mu, gamma, u) == pytest.approx(we / re)
    assert numbers.laplace(rho, mu, gamma, d) == pytest.approx(1 / oh**2)
    assert numbers.laplace_radius(rho, mu, gamma, a) == pytest.approx(1 / oh_a**2)
    assert numbers.z_number(rho, mu, gamma, d) == pytest.approx(1 / oh)


@given(density, viscosity, surface_tension, size)
def test_webers_wavelength_with_either_ohnesorge_number(
    rho: float, mu: float, gamma: float, d: float
) -> None:
    # Commonly garbled: the factor is 1 + 3 Oh with the number on the DIAMETER only. On the radius
    # lambda = 2 pi a (2 + 3 sqrt2 Oh_a)^(1/2).
    a = d / 2
    on_diameter = (
        math.sqrt(2) * math.pi * d * math.sqrt(1 + 3 * numbers.ohnesorge(rho, mu, gamma, d))
    )
    on_radius = (
        2 * math.pi * a
        * math.sqrt(2 + 3 * math.sqrt(2) * numbers.ohnesorge_radius(rho, mu, gamma, a))
    )  # fmt: skip
    assert on_diameter == pytest.approx(on_radius)


@pytest.mark.parametrize(
    ("oh_a", "x_m"),
    # Weber's optimum, computed in the project's reference: x_m = (2 + 3 sqrt2 Oh_a)^(-1/2).
    [(0.01, 0.699724034501), (0.1, 0.642258761786), (10.0, 0.150030447673)],
)
def test_ohnesorge_on_the_radius_gives_the_tabulated_optimum(oh_a: float, x_m: float) -> None:
    mu = oh_a * math.sqrt(998.0 * 0.0728 * 1e-4)  # a liquid with this number on a = 0.1 mm
    found = numbers.ohnesorge_radius(998.0, mu, 0.0728, 1e-4)
    assert (2 + 3 * math.sqrt(2) * found) ** -0.5 == pytest.approx(x_m, rel=1e-11)


def test_z_has_no_speed() -> None:
    # Commonly garbled: a liquid inside the Z window may still fail to leave the nozzle.
    assert "velocity" not in numbers.z_number.kinds
    inside = numbers.z_number(1000.0, 0.004, 0.030, 25e-6)
    assert 4 < inside < 14
    assert numbers.weber(1000.0, 0.030, 1.0, 25e-6) < 4
