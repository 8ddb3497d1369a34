"""Marangoni numbers: identities and sign."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers

value = st.floats(0.1, 10.0)


@given(value, value, value, value, value)
def test_heat_and_matter_are_one_number(
    mu: float, slope: float, alpha: float, dt: float, length: float
) -> None:
    heat = numbers.marangoni(mu, -slope, alpha, dt, length)
    matter = numbers.marangoni_mass(mu, slope * dt, alpha, length)
    assert heat == pytest.approx(matter)
    # Ma = Ca Pe with the speed that the difference drives, (difference of gamma) / mu.
    driven = slope * dt / mu
    assert heat == pytest.approx(numbers.peclet(alpha, driven, length))


def test_water_flows_towards_the_cold() -> None:
    # Surface tension of water falls by 0.15 mN/m per kelvin near 20 degC: slope of IAPWS R1-76,
    # 72.736 mN/m at 20 degC against 71.972 at 25 degC.
    slope = (71.972e-3 - 72.736e-3) / 5.0
    assert slope == pytest.approx(-0.15e-3, rel=0.03)
    assert numbers.marangoni(1e-3, slope, 1.43e-7, 1.0, 1e-3) > 0
    assert numbers.marangoni(1e-3, slope, 1.43e-7, -1.0, 1e-3) < 0
