"""Numbers of liquids with memory: identities that fix their scales."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers

value = st.floats(0.1, 10.0)


@given(value, value, value, value, value)
def test_elastocapillary_is_deborah_over_ohnesorge_on_the_radius(
    rho: float, mu: float, gamma: float, relaxation: float, a: float
) -> None:
    de = numbers.deborah(rho, gamma, relaxation, a)
    oh_a = numbers.ohnesorge_radius(rho, mu, gamma, a)
    ec = numbers.elastocapillary(mu, gamma, relaxation, a)
    assert ec == pytest.approx(de / oh_a)
    assert de == pytest.approx(relaxation / numbers.inertio_capillary_time_radius(rho, gamma, a))
    assert ec == pytest.approx(relaxation / numbers.visco_capillary_time_radius(mu, gamma, a))


def test_a_newtonian_liquid_has_no_memory() -> None:
    assert numbers.deborah(1000.0, 0.06, 0.0, 1e-4) == 0.0
    assert numbers.elastocapillary(0.01, 0.06, 0.0, 1e-4) == 0.0
    assert numbers.weissenberg(0.0, 1e5) == 0.0
    assert numbers.bingham(0.01, 0.0, 1.0, 1e-3) == 0.0


def test_exponential_thinning_in_units_of_deborah() -> None:
    # An Oldroyd-B thread thins as exp(-t / (3 lambda)) (project's reference, G23): after t = 3 De
    # inertio-capillary times it is thinner by e.
    rho, gamma, a, relaxation = 1000.0, 0.06, 50e-6, 1e-3
    unit = math.sqrt(rho * a**3 / gamma)
    time = 3 * numbers.deborah(rho, gamma, relaxation, a) * unit
    assert math.exp(-time / (3 * relaxation)) == pytest.approx(math.exp(-1))


def test_bingham_at_the_wall_of_a_tube() -> None:
    # Poiseuille: wall stress 8 mu U / d. It equals the yield stress where Bm = 8.
    mu, u, d = 0.1, 2.0, 1e-3
    assert numbers.bingham(mu, 8 * mu * u / d, u, d) == pytest.approx(8.0)


def test_weissenberg_with_the_wall_rate_of_a_nozzle() -> None:
    # 8 U / d at the wall: 5 m/s in 50 um is 8e5 1/s; a memory of 10 us makes 8.
    assert numbers.weissenberg("10 us", 8 * 5.0 / 50e-6) == pytest.approx(8.0)
