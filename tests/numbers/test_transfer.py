"""Numbers of heat and mass transfer at a surface."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers


# Documentation of the open-source library fluids 1.3.1.
def test_examples_of_another_implementation() -> None:
    assert numbers.nusselt(300.0, 1000.0, 1.2) == pytest.approx(4.0)
    assert numbers.biot(4000.0, 10000.0, 0.01) == pytest.approx(0.025)
    assert numbers.sherwood(300.0, 1000.0, 1.2) == pytest.approx(4.0)
    assert numbers.jakob(2e6, 4000.0, 10.0) == pytest.approx(0.02)


def test_a_sphere_in_a_still_gas_has_two() -> None:
    # Steady diffusion from a sphere: flux D dc / a at the surface, so that k_m = D / a, Sh = 2.
    diffusivity, radius = 2.5e-5, 40e-6
    assert numbers.sherwood(diffusivity, diffusivity / radius, 2 * radius) == pytest.approx(2.0)
    conductivity = 0.026
    assert numbers.nusselt(conductivity, conductivity / radius, 2 * radius) == pytest.approx(2.0)


@given(st.floats(0.0, 0.999), st.floats(0.0, 0.999))
def test_spalding_mass_gives_the_stefan_flow(surface: float, far: float) -> None:
    # 1 + B_M = (1 - Y_inf) / (1 - Y_s): the rate of Stefan's problem goes as its logarithm.
    found = numbers.spalding_mass(surface, far)
    assert 1 + found == pytest.approx((1 - far) / (1 - surface), rel=1e-9)


def test_spalding_mass_in_the_limits() -> None:
    assert numbers.spalding_mass(0.01) == pytest.approx(0.01 / 0.99)
    assert math.log1p(numbers.spalding_mass(1e-6)) == pytest.approx(1e-6, rel=1e-5)
    assert numbers.spalding_mass(0.02, 0.02) == 0.0
    assert numbers.spalding_mass(0.01, 0.02) < 0  # condensation


def test_spalding_mass_at_the_boiling_point_is_nan_with_a_warning() -> None:
    from dropkit.errors import DropkitWarning

    with pytest.warns(DropkitWarning, match="became NaN"):
        assert math.isnan(numbers.spalding_mass(1.0))


def test_biot_rule_on_the_diameter() -> None:
    # Common practice: one temperature below 0.1 on volume over surface, d / 6 for a sphere.
    h, k, d = 500.0, 0.6, 1e-3
    on_volume = h * (d / 6) / k
    assert numbers.biot(k, h, d) == pytest.approx(6 * on_volume)
    (limit,) = numbers.limits_of("biot")
    assert limit.bounds[0] == pytest.approx(6 * 0.1)


def test_signs() -> None:
    assert numbers.jakob(2e6, 4000.0, -10.0) < 0
    assert numbers.spalding_heat(2.4e6, 1900.0, -10.0) < 0
    assert numbers.stefan(6e4, 400.0, -10.0) < 0
    # Energy balance: a melt that could give all of h_f to solid cooled by h_f / c_p has Ste = 1.
    assert numbers.stefan(6e4, 400.0, 150.0) == pytest.approx(1.0)
