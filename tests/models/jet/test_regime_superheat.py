"""Flash boiling at the outlet: every propellant in the open air is refused, and what else boils."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import BadInput, OutOfRange, UnitError
from dropkit.models import jet

PROPELLANTS = sorted(dk.liquids().query("family == 'propellant'").index)


def test_there_are_propellants() -> None:
    assert {"propane", "n-butane", "isobutane", "dimethyl_ether", "hfa-134a"} <= set(PROPELLANTS)


@pytest.mark.parametrize("key", PROPELLANTS)
def test_every_propellant_boils_in_the_open_air(key: str) -> None:
    fluid = dk.liquid(key)
    found = jet.outlet_superheat(fluid, "20 degC")
    assert found.boils is True
    assert found.ratio > 1.5
    with pytest.raises(OutOfRange, match=r"boils as it leaves.*flash boiling"):
        found.refuse()
    with pytest.raises(OutOfRange, match="flash boiling"):
        jet.superheat_ratio(fluid.vapour_pressure(293.15), 101325.0)
    # Not inside a vessel at more than its vapour pressure.
    closed = jet.outlet_superheat(fluid, "20 degC", "10 bar")
    assert closed.boils is False
    closed.refuse()


@pytest.mark.parametrize(
    ("name", "temperature", "boils"),
    [
        ("water", "20 degC", False),
        ("water", "99 degC", False),
        ("water", "101 degC", True),
        ("ethanol", "20 degC", False),
        ("n-pentane", "20 degC", False),
        ("n-pentane", "37 degC", True),
    ],
)
def test_the_boiling_point_decides(name: str, temperature: str, boils: bool) -> None:
    found = jet.outlet_superheat(dk.liquid(name), temperature)
    assert found.boils is boils
    assert ("jet theory refused" in str(found)) is boils


def test_low_pressure_boils_what_is_cold() -> None:
    assert jet.outlet_superheat(dk.liquid("water"), "20 degC", "2 kPa").boils is True


@given(st.floats(1e-3, 1e7), st.floats(1e-3, 1e7))
def test_ratio(vapour: float, ambient: float) -> None:
    assert jet.superheat_ratio(vapour, ambient, outside="allow") == vapour / ambient
    inside = jet.superheat_ratio(vapour, ambient, outside="nan")
    assert np.isnan(inside) == (vapour / ambient > 1.0)


def test_arrays() -> None:
    water = dk.liquid("water")
    found = jet.outlet_superheat(water, np.array([293.15, 350.0, 380.0]))
    assert found.boils.tolist() == [False, False, True]
    assert "in 1 of 3 cases" in str(found)
    with pytest.raises(OutOfRange, match="1 of 3"):
        found.refuse()
    with pytest.raises(OutOfRange, match="1 of 3 values"):
        jet.superheat_ratio(water.vapour_pressure(np.array([293.15, 350.0, 380.0])), 101325.0)


def test_own_fluid_and_bad_input() -> None:
    with pytest.raises(BadInput, match="no vapour pressure"):
        jet.outlet_superheat("propane", 293.15)
    with pytest.raises(UnitError):
        jet.outlet_superheat(dk.liquid("propane"), 293.15, "1 m")
    with pytest.raises(BadInput, match="outside"):
        jet.superheat_ratio(1e3, 1e5, outside="clip")  # type: ignore[arg-type]
