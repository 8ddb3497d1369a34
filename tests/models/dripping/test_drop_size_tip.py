"""Drops from tips: worked values, weighed drops, convergence, limits and the way back.

Marks: [S] seen in the source, [M] from memory, [C] computed from the stated formula.
"""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import assume, given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import BadInput, OutOfRange, RangeWarning, UnitError, Unphysical
from dropkit.models import dripping
from dropkit.published_rows import published_file
from dropkit.records import data_dir

PUBLISHED = data_dir() / "published" / "dripping"
WATER = (998.207, 0.07274)
CURVES = ("table", "quadratic", "polynomial", "power")


def residual(volume: float, bond: float, radius: float, factor: str = "table") -> float:
    """Departure from phi^3 psi(phi) = Bo/(2 pi)."""
    psi = {
        "table": dripping.drop_weight_factor,
        "quadratic": dripping.drop_weight_factor_quadratic,
        "polynomial": dripping.drop_weight_factor_polynomial,
        "power": dripping.drop_weight_factor_power,
    }[factor]
    ratio = radius / volume ** (1.0 / 3.0)
    return ratio**3 * psi(ratio, outside="allow") * 2.0 * math.pi / bond - 1.0


def test_worked_value() -> None:
    """Water at 20 degC, r = 1.5 mm [C]: phi 0.4142, 47.42 mg, 4.493 mm; 1 %."""
    volume = dripping.drop_volume_tip(*WATER, 3e-3)
    assert 1.5e-3 / volume ** (1 / 3) == pytest.approx(0.4142, abs=5e-5)
    assert dripping.drop_mass_tip(*WATER, 3e-3) == pytest.approx(47.42e-6, abs=5e-9)
    assert dripping.drop_diameter_tip(*WATER, 3e-3) == pytest.approx(4.493e-3, abs=5e-7)
    for factor in CURVES:
        assert dripping.drop_mass_tip(*WATER, 3e-3, factor=factor) == pytest.approx(
            47.42e-6, rel=0.01
        )


@pytest.mark.parametrize("factor", CURVES)
@given(bond=st.floats(1e-12, 7.0))
def test_the_implicit_volume_converges(factor: str, bond: float) -> None:
    radius = math.sqrt(bond)  # with rho g/gamma = 1
    volume = dripping.drop_volume_tip(1.0, 1.0, 2.0 * radius, 1.0, factor=factor, outside="nan")
    assume(not math.isnan(volume))  # outside the range of that curve
    assert residual(volume, bond, radius, factor) == pytest.approx(0.0, abs=1e-12)


def test_each_curve_up_to_the_ends_of_its_range() -> None:
    ends = {"table": 1.2, "quadratic": 1.2, "polynomial": 1.2, "power": 0.8}
    for factor, high in ends.items():
        # From phi to the tip: r = phi V^(1/3), with V = 1 and the tension that this asks for.
        tension = dripping.interfacial_tension_drop_volume(
            2.0, 1.0, 2.0 * high, 1.0, 1.0, factor=factor
        )
        assert dripping.drop_volume_tip(
            1.0, tension, 2.0 * high, 1.0, factor=factor
        ) == pytest.approx(1.0, rel=1e-9)
        with pytest.raises(OutOfRange, match="pool"):
            dripping.drop_volume_tip(1.0, tension, 2.02 * high, 1.0, factor=factor)


def test_too_narrow_for_a_curve() -> None:
    needle = 0.82e-3
    assert dripping.drop_mass_tip(*WATER, needle) == pytest.approx(16.28e-6, rel=1e-3)
    with pytest.raises(OutOfRange, match="'table' or 'polynomial' reaches down to 0"):
        dripping.drop_mass_tip(*WATER, needle, factor="quadratic")
    with pytest.warns(RangeWarning, match="Bond number"):
        extrapolated = dripping.drop_mass_tip(*WATER, needle, factor="quadratic", outside="warn")
    assert extrapolated == pytest.approx(16.28e-6, rel=0.03)
    with pytest.raises(BadInput, match="factor='tate' is not known"):
        dripping.drop_mass_tip(*WATER, needle, factor="tate")


def test_standard_dropper() -> None:
    """20, 65 and 87 drops to a gram at a drop per second [S; the rate M]: slow drops are lighter."""
    rows = published_file(PUBLISHED / "StandardDropper.csv")
    spirit = dk.mixture({"ethanol": 0.95, "water": "rest"}, by="volume")
    found = []
    for row, liquid in zip(
        rows, (dk.liquid("water"), spirit, dk.liquid("diethyl ether")), strict=True
    ):
        tip = dripping.wetted_tip_diameter(float(row["bore_m"]), float(row["outer_diameter_m"]))
        slow = dripping.drop_mass_tip(liquid.density(293.15), liquid.surface_tension(293.15), tip)
        found.append(1e-3 / float(row["drops_per_gram"]) / slow - 1.0)
    assert found == pytest.approx([0.054, 0.096, 0.12], abs=0.006)


def test_eschbaums_tips() -> None:
    """Water at 15 degC, rate not told [S]: thin tips within 3 %, wide ones 7 to 9 % heavier."""
    rows = published_file(PUBLISHED / "Eschbaum1895.csv")
    tip = np.array([float(row["outer_diameter_m"]) for row in rows])
    mass = np.array([float(row["mass_kg"]) for row in rows])
    water = dk.liquid("water")
    slow = dripping.drop_mass_tip(
        water.density(288.15), water.surface_tension(288.15), tip, outside="nan"
    )
    departure = mass / slow - 1.0
    assert departure[:2] == pytest.approx([-0.026, 0.021], abs=0.003)
    assert departure[2:6] == pytest.approx([0.068, 0.091, 0.068, 0.074], abs=0.003)
    assert np.isnan(departure[6])  # 14.9 mm: wider than the table


@given(
    tip=st.floats(1e-4, 1.4e-2),
    density=st.floats(700.0, 1300.0),
    tension=st.floats(0.02, 0.075),
)
def test_real_drops_are_smaller_than_ideal_ones(tip: float, density: float, tension: float) -> None:
    real = dripping.drop_volume_tip(density, tension, tip, outside="nan")
    assume(not math.isnan(real))
    ideal = dripping.drop_volume_ideal(density, tension, tip)
    assert 0.598 * ideal < real < ideal
    assert dripping.drop_mass_ideal(tension, tip) == pytest.approx(density * ideal, rel=1e-12)
    assert dripping.drop_diameter_ideal(density, tension, tip) ** 3 * math.pi / 6 == pytest.approx(
        ideal, rel=1e-12
    )


def test_a_vanishing_tip_gives_the_ideal_drop() -> None:
    # psi falls from 1 as phi itself, and phi goes with the two thirds of the tip.
    for tip in (1e-6, 1e-8, 1e-10):
        share = dripping.drop_volume_tip(*WATER, tip) / dripping.drop_volume_ideal(*WATER, tip)
        ratio = 0.5 * tip / dripping.drop_volume_tip(*WATER, tip) ** (1 / 3)
        assert share == pytest.approx(1.0 - ratio * (1.0 - 0.7256) / 0.30, rel=1e-9)
    assert share == pytest.approx(1.0, abs=1e-5)


@pytest.mark.parametrize("factor", ["table", "polynomial"])
@given(tip=st.floats(1e-6, 1.2e-2), tension=st.floats(0.02, 0.5))
def test_there_and_back(factor: str, tip: float, tension: float) -> None:
    options = {"factor": factor, "outside": "nan"}
    drop = dripping.drop_diameter_tip(1000.0, tension, tip, **options)
    assume(not math.isnan(drop))
    assert dripping.tip_diameter_for_drop(1000.0, tension, drop, factor=factor) == pytest.approx(
        tip, rel=1e-11
    )
    mass = dripping.drop_mass_tip(1000.0, tension, tip, factor=factor)
    assert dripping.surface_tension_drop_weight(1000.0, mass, tip, factor=factor) == pytest.approx(
        tension, rel=1e-11
    )


@given(tip=st.floats(1e-5, 1.2e-2), scale=st.floats(0.1, 10.0))
def test_drops_scale_with_the_capillary_length(tip: float, scale: float) -> None:
    """Twice the length scale, the same shape: gamma with the square, volume with the cube."""
    before = dripping.drop_volume_tip(1000.0, 0.07, tip)
    after = dripping.drop_volume_tip(1000.0, 0.07 * scale**2, tip * scale)
    assert after == pytest.approx(before * scale**3, rel=1e-11)


def test_wider_tips_give_larger_drops_but_less_than_in_proportion() -> None:
    tips = np.geomspace(1e-5, 1.4e-2, 400)
    volume = dripping.drop_volume_tip(*WATER, tips)
    assert (np.diff(volume) > 0.0).all()
    per_tip = volume / tips
    assert (np.diff(per_tip[tips < 8e-3]) < 0.0).all()


def test_small_drops_ask_for_very_thin_tips() -> None:
    assert dripping.tip_diameter_for_drop(*WATER, 3e-3) == pytest.approx(0.698e-3, rel=1e-3)
    assert dripping.tip_diameter_for_drop(*WATER, 0.1e-3) == pytest.approx(
        # The ideal drop: d = rho g D^3/(6 gamma).
        998.207 * 9.80665 * 1e-12 / (6 * 0.07274),
        rel=1e-3,
    )
    with pytest.raises(OutOfRange, match="fall from no tip"):
        dripping.tip_diameter_for_drop(*WATER, 8e-3)


def test_spread() -> None:
    found = dripping.drop_volume_spread(*WATER, np.array([0.3e-3, 0.82e-3, 3e-3, 9e-3]))
    assert (found.low <= found.volume).all()
    assert (found.volume <= found.high).all()
    width = (found.high - found.low) / found.volume
    assert width[1] == pytest.approx(0.0527, abs=1e-3)
    assert (width[2:] < 0.012).all()
    assert np.isnan(dripping.drop_volume_spread(*WATER, 0.02, outside="nan")).all()
    with pytest.raises(OutOfRange):
        dripping.drop_volume_spread(*WATER, 0.02)


def test_wetted_tip() -> None:
    assert dripping.wetted_tip_diameter(0.6e-3, 3e-3) == 3e-3
    assert dripping.wetted_tip_diameter(0.6e-3, 3e-3, wets=False) == 0.6e-3
    with pytest.raises(Unphysical, match="not larger"):
        dripping.wetted_tip_diameter(3e-3, 0.6e-3)
    with pytest.raises(Unphysical, match="not larger"):
        dripping.wetted_tip_diameter(np.array([1e-3, 3e-3]), 2e-3)
    with pytest.raises(BadInput, match="neither true nor false"):
        dripping.wetted_tip_diameter(0.6e-3, 3e-3, wets=1)


def test_radius_for_diameter_shows() -> None:
    """Half the tip is not half the drop: a slip of radius for diameter shows in the weight."""
    right = dripping.drop_mass_tip(*WATER, 3e-3)
    slip = dripping.drop_mass_tip(*WATER, 1.5e-3)
    assert 0.5 < slip / right < 0.62


def test_units() -> None:
    found = dripping.drop_mass_tip("998.207 kg/m3", "72.74 mN/m", "3 mm")
    assert found.to("mg").magnitude == pytest.approx(47.42, abs=0.005)
    with pytest.raises(UnitError, match="surface_tension"):
        dripping.drop_mass_tip(998.207, "72.74 mPa*s", "3 mm")
