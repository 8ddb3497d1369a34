"""The splash parameter: check value, its three forms, and its square."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers


def test_check_value() -> None:
    # Project's reference: 30 um drop, 10 mPa s, 1000 kg/m3, 30 mN/m at 6 m/s: We 36, Re 18.
    found = numbers.splash_parameter(1000.0, 0.010, 0.030, 6.0, 30e-6)
    assert found == pytest.approx(12.35860286, rel=1e-9)


@given(
    st.floats(500.0, 2e4),
    st.floats(1e-4, 10.0),
    st.floats(0.005, 2.0),
    st.floats(1e-3, 100.0),
    st.floats(1e-6, 1e-2),
)
def test_forms(rho: float, mu: float, gamma: float, u: float, d: float) -> None:
    # Commonly garbled: K = We^(1/2) Re^(1/4) = Oh Re^(5/4); some papers quote K^2 = We Re^(1/2).
    k = numbers.splash_parameter(rho, mu, gamma, u, d)
    we, re = numbers.weber(rho, gamma, u, d), numbers.reynolds(rho, mu, u, d)
    assert k == pytest.approx(math.sqrt(we) * re**0.25)
    assert k == pytest.approx(numbers.ohnesorge(rho, mu, gamma, d) * re**1.25)
    assert k**2 == pytest.approx(we * math.sqrt(re))


def test_quoted_limits_are_on_k() -> None:
    assert {limit.bounds[0] for limit in numbers.limits_of("splash_parameter")} == {50.0, 57.7}
    assert round(57.7**2, -1) == 3330.0
