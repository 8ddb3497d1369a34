"""Speed and flow of a round jet: values by hand, scaling, and what is refused."""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import UnitError, Unphysical
from dropkit.models import jet

flows = st.floats(1e-13, 1e-2)
diameters = st.floats(1e-7, 1e-1)
speeds = st.floats(1e-3, 1e3)
factors = st.floats(1e-2, 1e2)


def test_by_hand() -> None:
    # A jet of 2 mm has a section of pi mm2: pi cm3/s run through it at 1 m/s.
    assert jet.jet_velocity(math.pi * 1e-6, 2e-3) == pytest.approx(1.0, rel=1e-14)
    assert jet.jet_flow(1.0, 2e-3) == pytest.approx(math.pi * 1e-6, rel=1e-14)


def test_by_hand_with_units() -> None:
    # 6 mL/min are 1e-7 m3/s; over pi/4 (0.1 mm)2 = 7.853982e-9 m2 that is 12.732395 m/s.
    velocity = jet.jet_velocity("6 mL/min", "100 um")
    assert str(velocity.units) == "meter / second"
    assert velocity.magnitude == pytest.approx(12.732395, rel=1e-7)
    # 20 m/s through 50 um, 1.9634954e-9 m2: 3.9269908e-8 m3/s, or 2.3561945 mL/min.
    flow = jet.jet_flow("20 m/s", "50 um")
    assert str(flow.units) == "milliliter / minute"
    assert flow.magnitude == pytest.approx(2.3561945, rel=1e-7)
    # A US gallon is 231 inch3: 231/60 inch3/s over pi/4 inch2 are 15.4/pi = 4.9019722 inch/s.
    inch = jet.jet_velocity("1 gpm", "1 in")
    assert inch.magnitude == pytest.approx(4.9019722 * 0.0254, rel=1e-7)


def test_arrays() -> None:
    found = jet.jet_velocity(np.array([[1e-7], [4e-7]]), np.array([1e-4, 2e-4, np.nan]))
    once = 12.732395447351627  # 40/pi
    expected = [[once, once / 4, np.nan], [4 * once, once, np.nan]]
    np.testing.assert_allclose(found, expected, rtol=1e-14)


@given(flows, diameters, factors)
def test_speed_scales_with_flow_over_diameter_squared(q: float, d: float, by: float) -> None:
    base = jet.jet_velocity(q, d)
    assert jet.jet_velocity(by * q, d) == pytest.approx(by * base, rel=1e-13)
    assert jet.jet_velocity(q, by * d) == pytest.approx(base / by**2, rel=1e-13)


@given(speeds, diameters, factors)
def test_flow_scales_with_speed_times_diameter_squared(u: float, d: float, by: float) -> None:
    base = jet.jet_flow(u, d)
    assert jet.jet_flow(by * u, d) == pytest.approx(by * base, rel=1e-13)
    assert jet.jet_flow(u, by * d) == pytest.approx(by**2 * base, rel=1e-13)


@given(flows, diameters)
def test_each_undoes_the_other(q: float, d: float) -> None:
    assert jet.jet_flow(jet.jet_velocity(q, d), d) == pytest.approx(q, rel=1e-14)


def test_what_is_refused() -> None:
    with pytest.raises(Unphysical, match="velocity"):
        jet.jet_flow(0.0, 1e-4)
    with pytest.raises(Unphysical, match="flow"):
        jet.jet_velocity(-1e-7, 1e-4)
    with pytest.raises(Unphysical, match="jet_diameter"):
        jet.jet_velocity(1e-7, 0.0)
    with pytest.raises(UnitError, match="density"):
        jet.jet_velocity("6 g/min", "100 um")  # a mass flow
