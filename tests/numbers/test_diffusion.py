"""Numbers of diffusion: check values, identities, and the 8 of the drying number."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers

value = st.floats(0.1, 10.0)


# Documentation of the open-source library fluids 1.3.1.
def test_examples_of_another_implementation() -> None:
    assert numbers.prandtl(4.61e-6, 1637.0, 0.010) == pytest.approx(0.754657)
    assert numbers.schmidt(800.0, 4.61e-6, 2e-6) == pytest.approx(0.00288125)
    assert numbers.lewis(800.0, 2200.0, 0.2, 22.6e-6) == pytest.approx(0.00502815768302494)
    assert numbers.peclet_heat(1000.0, 4000.0, 0.6, 1.5, 2.0) == pytest.approx(2e7)
    assert numbers.peclet(1e-9, 1.5, 2.0) == pytest.approx(3e9)
    assert numbers.fourier(1000.0, 4000.0, 0.6, 2.0, 1.5) == pytest.approx(5.625e-8)
    assert numbers.fourier_mass(1e-9, 2.0, 1.5) == pytest.approx(3.75e-10)


def test_prandtl_of_water_and_air() -> None:
    # Common knowledge, three-figure values at 20 degC [from memory]: water 7.0, air 0.71.
    assert numbers.prandtl(1.0016e-3, 4184.0, 0.598) == pytest.approx(7.0, rel=0.01)
    assert numbers.prandtl(1.81e-5, 1006.0, 0.0257) == pytest.approx(0.71, rel=0.01)


@given(value, value, value, value, value, value, value)
def test_identities(
    rho: float, mu: float, cp: float, k: float, diffusivity: float, u: float, d: float
) -> None:
    sc, pr = numbers.schmidt(rho, mu, diffusivity), numbers.prandtl(mu, cp, k)
    re = numbers.reynolds(rho, mu, u, d)
    assert numbers.lewis(rho, cp, k, diffusivity) == pytest.approx(sc / pr)
    assert numbers.peclet(diffusivity, u, d) == pytest.approx(re * sc)
    assert numbers.peclet_heat(rho, cp, k, u, d) == pytest.approx(re * pr)
    alpha = k / (rho * cp)
    assert numbers.peclet_heat(rho, cp, k, u, d) == pytest.approx(numbers.peclet(alpha, u, d))
    assert numbers.fourier(rho, cp, k, d, u) == pytest.approx(numbers.fourier_mass(alpha, d, u))


@given(st.floats(1e-11, 1e-8), st.floats(1e-11, 1e-7), st.floats(1e-6, 1e-3))
def test_the_drying_number_is_radius_times_surface_speed_over_diffusivity(
    diffusivity: float, constant: float, d0: float
) -> None:
    # Commonly garbled: the 8 belongs to d^2 = d0^2 - K t. A short step of that law gives the
    # speed of the surface.
    step = 1e-6 * d0**2 / constant
    radii = [0.5 * math.sqrt(d0**2 - constant * t) for t in (0.0, step)]
    speed = (radii[0] - radii[1]) / step
    found = numbers.peclet_evaporation(diffusivity, constant)
    assert found == pytest.approx(radii[0] * speed / diffusivity, rel=1e-5)


def test_a_drying_water_drop() -> None:
    # Project's reference: K = 587.3 um2/s at 20 degC, 50 %; the 100 um drop lasts 17.03 s.
    constant = 587.3e-12
    assert (100e-6) ** 2 / constant == pytest.approx(17.03, rel=1e-3)
    assert numbers.peclet_evaporation(constant / 8, "587.3 um^2/s") == pytest.approx(1.0)
