"""Each criterion of a regime by itself: check values, limits and scalings.

Marks: [S2] seen in someone else's copy, [C] computed from the closed formula elsewhere.
"""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers
from dropkit.errors import OutOfRange, Unphysical
from dropkit.models import jet

WATER = (998.2, 0.0727)


def tube_with(bond: float, outer_bond: float) -> tuple[float, float, float, float, float]:
    """A liquid and a tube that have these numbers, Bo = [rho g D^2/(2 gamma)]^(1/2)."""
    return 2.0, 1.0, bond, outer_bond, 1.0


# --- gravity: Clanet & Lasheras -----------------------------------------------------------------
@pytest.mark.parametrize(
    ("bond", "outer", "weber"), [(0.5, 0.5, 1.7032845416), (0.5, 0.7, 2.0454170585)]
)
def test_clanet_lasheras_closed_values(bond: float, outer: float, weber: float) -> None:
    # [C], with K = 0.37
    assert jet.jetting_weber_gravity(*tube_with(bond, outer)) == pytest.approx(weber, rel=1e-10)


def printed(bond: float, outer: float, constant: float) -> float:
    """The equation as printed [S2]."""
    y = 1.0 + constant * outer * bond
    return 4.0 * outer / bond * (y - math.sqrt(y * y - 1.0)) ** 2


@given(bond=st.floats(0.01, 3.0), wall=st.floats(1.0, 5.0), constant=st.floats(0.05, 2.0))
def test_clanet_lasheras_as_printed(bond: float, wall: float, constant: float) -> None:
    found = jet.jetting_weber_gravity(*tube_with(bond, bond * wall), constant=constant)
    assert found == pytest.approx(printed(bond, bond * wall, constant), rel=1e-10)


def test_fine_tubes_tend_to_four() -> None:
    for bond in (1e-3, 1e-6, 1e-9):
        found = jet.jetting_weber_gravity(*tube_with(bond, bond))
        assert found == pytest.approx(
            4.0 * (1.0 - 2.0 * math.sqrt(2.0 * 0.37) * bond), abs=6 * bond**2
        )
    assert found == pytest.approx(4.0, rel=1e-8)


@given(tube=st.floats(1e-5, 8e-3), wall=st.floats(1.0, 4.0))
def test_wide_tubes_jet_sooner_and_thick_walls_later(tube: float, wall: float) -> None:
    thin = jet.jetting_weber_gravity(*WATER, tube, tube)
    assert jet.jetting_weber_gravity(*WATER, 1.1 * tube, 1.1 * tube) < thin <= 4.0
    # The wall acts through the ring of liquid that must be pulled in.
    if numbers.bond(*WATER, tube) < 0.5:
        assert jet.jetting_weber_gravity(*WATER, tube, wall * tube) >= thin * (1.0 - 1e-12)


@given(tube=st.floats(1e-5, 8e-3), wall=st.floats(1.0, 3.0))
def test_speed_and_flow_follow_from_the_weber_number(tube: float, wall: float) -> None:
    args = (*WATER, tube, wall * tube)
    speed = jet.jetting_velocity_gravity(*args)
    weber = numbers.weber(*WATER, speed, tube)
    assert weber == pytest.approx(jet.jetting_weber_gravity(*args), rel=1e-12)
    assert jet.jetting_flow_gravity(*args) == pytest.approx(jet.jet_flow(speed, tube), rel=1e-12)


def test_outer_inside_inner_is_refused() -> None:
    for ask in (jet.jetting_weber_gravity, jet.jetting_velocity_gravity, jet.jetting_flow_gravity):
        with pytest.raises(Unphysical, match="smaller than the inner"):
            ask(*WATER, 2e-3, np.array([3e-3, 1e-3]))


# --- fixed numbers ------------------------------------------------------------------------------
@given(length=st.floats(1e-6, 1e-2), gas=st.floats(0.01, 50.0), tension=st.floats(0.01, 0.5))
def test_each_speed_has_its_weber_number(length: float, gas: float, tension: float) -> None:
    for function, number in (
        (jet.first_wind_velocity, 0.4),
        (jet.second_wind_velocity, 13.0),
        (jet.atomisation_velocity, 40.3),
    ):
        speed = function(tension, length, gas)
        assert numbers.gas_weber(tension, speed, length, gas) == pytest.approx(number, rel=1e-12)
    speed = jet.jetting_velocity_weber(1000.0, tension, length)
    assert numbers.weber(1000.0, tension, speed, length) == pytest.approx(8.0, rel=1e-12)


def test_liquid_and_gas_numbers_are_not_mixed_up() -> None:
    """Eight on the gas in place of the liquid would ask for 29 times the speed."""
    right = jet.jetting_velocity_weber(*WATER, 60e-6)
    assert right == pytest.approx(3.116, abs=1e-3)
    assert jet.first_wind_velocity(0.0727, 60e-6, 1.2) == pytest.approx(20.10, abs=5e-3)


# --- with viscosity -----------------------------------------------------------------------------
def test_viscous_closed_value() -> None:
    # 1.2 + 3.41 Oh^0.9 at Oh = 0.1 gives 1.629293565 [C]
    assert jet.first_wind_weber_viscous(1.0, 0.1, 1.0, 1.0) == pytest.approx(1.629293565, rel=1e-9)
    assert jet.first_wind_weber_viscous(1.0, 1e-9, 1.0, 1.0) == pytest.approx(1.2, abs=1e-7)


@given(viscosity=st.floats(1e-4, 1.0), length=st.floats(1e-5, 1e-2), gas=st.floats(0.1, 1.99))
def test_viscous_speed(viscosity: float, length: float, gas: float) -> None:
    speed = jet.first_wind_velocity_viscous(1000.0, viscosity, 0.05, length, gas)
    weber = jet.first_wind_weber_viscous(1000.0, viscosity, 0.05, length)
    assert numbers.gas_weber(0.05, speed, length, gas) == pytest.approx(weber, rel=1e-12)
    # The authors part by a factor of 3 and more in the number.
    assert speed > 1.73 * jet.first_wind_velocity(0.05, length, gas)


def test_dense_gas_is_out_of_range() -> None:
    with pytest.raises(OutOfRange, match="density over gas_density"):
        jet.first_wind_velocity_viscous(1000.0, 1e-3, 0.07, 1e-4, 20.0)
    found = jet.first_wind_velocity_viscous(
        1000.0, 1e-3, 0.07, 1e-4, np.array([1.2, 20.0]), outside="nan"
    )
    assert np.isnan(found).tolist() == [False, True]
