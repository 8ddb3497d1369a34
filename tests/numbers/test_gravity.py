"""Numbers of weight: check values, identities, and the forms that go by the same name."""

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


# Documentation of the open-source library fluids 1.3.1, which uses g = 9.80665.
def test_examples_of_another_implementation() -> None:
    assert numbers.bond(1000.0 - 1.2, 0.0589, 2.0) == pytest.approx(665187.2339558573)
    morton = numbers.morton(1077.0, 4.27e-3, 0.023, 76.5)
    assert morton == pytest.approx(2.311183104430743e-07)
    assert numbers.archimedes(3000.0, 0.002, 2.0, 1e-3) == pytest.approx(470.4053872)


@given(density, viscosity, surface_tension, speed, size)
def test_identities(rho: float, mu: float, gamma: float, u: float, d: float) -> None:
    bond = numbers.bond(rho, gamma, d)
    fr, re, we = (
        numbers.froude(u, d),
        numbers.reynolds(rho, mu, u, d),
        numbers.weber(rho, gamma, u, d),
    )
    assert bond == pytest.approx(we / fr**2)
    assert bond == pytest.approx(4 * numbers.bond_radius(rho, gamma, d / 2))
    assert bond == pytest.approx((d / numbers.capillary_length(rho, gamma)) ** 2)
    assert numbers.morton(rho, mu, gamma) == pytest.approx(we**3 / (fr**2 * re**4))
    oh = numbers.ohnesorge(rho, mu, gamma, d)
    assert numbers.morton(rho, mu, gamma) == pytest.approx(bond * oh**4)
    assert numbers.galilei(rho, mu, d) == pytest.approx((re / fr) ** 2)
    assert numbers.galilei(rho, mu, d) == pytest.approx(bond / oh**2)


@given(density, surface_tension, size)
def test_the_root_form_has_a_root_and_a_factor_two(rho: float, gamma: float, d: float) -> None:
    # Commonly garbled: Clanet and Lasheras write [rho g D^2 / (2 gamma)]^(1/2).
    found = numbers.bond_root(rho, gamma, d)
    assert found == pytest.approx(math.sqrt(numbers.bond(rho, gamma, d) / 2))
    assert found == pytest.approx(d / (math.sqrt(2) * numbers.capillary_length(rho, gamma)))


def test_the_root_form_gives_the_published_limit_of_dripping() -> None:
    # Clanet and Lasheras 1999: We_c -> 4 as Bo -> 0; computed in the project's reference for
    # Bo = Bo_o = 0.5: 1.7032845416, with K = 0.37.
    diameter = 0.5 * math.sqrt(2) * numbers.capillary_length(998.2, 0.0727)
    bo = numbers.bond_root(998.2, 0.0727, diameter)
    assert bo == pytest.approx(0.5)
    kick = 1 + 0.37 * bo * bo
    assert 4 * (kick - math.sqrt(kick**2 - 1)) ** 2 == pytest.approx(1.7032845416, rel=1e-9)


def test_stokes_settling_gives_archimedes_over_18() -> None:
    # 10 um sphere of unit density, air of 18.1 uPa s, g = 9.81: without slip it falls at
    # rho d^2 g / (18 mu); Hinds' table gives 3.06 mm/s with slip, here without.
    rho, d, rho_g, mu_g = 1000.0, 10e-6, 1.205, 1.81e-5
    v = (rho - rho_g) * d**2 * 9.81 / (18 * mu_g)
    assert v == pytest.approx(3.06e-3, rel=0.02)
    re = numbers.gas_reynolds(v, d, rho_g, mu_g)
    assert re == pytest.approx(numbers.archimedes(rho, d, rho_g, mu_g, gravity=9.81) / 18)


def test_signs_and_weightlessness() -> None:
    assert numbers.archimedes(1.0, 1e-3, 1000.0, 1e-3) < 0  # a bubble rises
    assert numbers.morton(1000.0, 1e-3, 0.07, gas_density=1200.0) < 0
    assert numbers.bond(1000.0, 0.07, 1e-3, gravity=0.0) == 0.0
