"""Drops of one liquid in another: buoyancy in place of weight, and the same curves."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import Unphysical
from dropkit.models import dripping

OIL = (860.0, 0.036)


@given(
    tip=st.floats(1e-5, 3e-3),
    density=st.floats(600.0, 900.0),
    tension=st.floats(0.02, 0.06),
)
def test_it_is_the_drop_in_air_with_the_difference_of_densities(
    tip: float, density: float, tension: float
) -> None:
    found = dripping.drop_volume_liquid(density, tension, tip, 998.0)
    assert found == dripping.drop_volume_tip(998.0 - density, tension, tip)
    # Rising or sinking is the same.
    assert found == dripping.drop_volume_liquid(998.0, tension, tip, density)


@given(tip=st.floats(1e-5, 5e-3), outer=st.floats(900.0, 2000.0))
def test_there_and_back(tip: float, outer: float) -> None:
    drop = dripping.drop_diameter_liquid(*OIL, tip, outer)
    assert dripping.tip_diameter_for_drop_liquid(*OIL, drop, outer) == pytest.approx(tip, rel=1e-11)
    volume = dripping.drop_volume_liquid(*OIL, tip, outer)
    assert volume == pytest.approx(np.pi / 6.0 * drop**3, rel=1e-12)
    assert dripping.interfacial_tension_drop_volume(860.0, volume, tip, outer) == pytest.approx(
        0.036, rel=1e-11
    )


def test_the_other_notation() -> None:
    """gamma = V drho g F/r, F = 1/(2 pi psi), by Heertjes et al. [S2]."""
    tip, volume = 2e-3, 1.2e-7
    ratio = 1e-3 / volume ** (1 / 3)
    form = 0.14782 + 0.27896 * ratio - 0.1662 * ratio**2
    by_hand = volume * 138.0 * 9.80665 * form / 1e-3
    # The ratio 0.203 lies below that fit's range.
    found = dripping.interfacial_tension_drop_volume(
        860.0, volume, tip, 998.0, factor="quadratic", outside="allow"
    )
    assert found == pytest.approx(by_hand, rel=1e-12)


def test_air_around_the_drop_is_a_matter_of_a_tenth_of_a_percent() -> None:
    in_air = dripping.drop_volume_liquid(998.2, 0.0727, 3e-3, 1.2)
    in_vacuum = dripping.drop_volume_tip(998.2, 0.0727, 3e-3)
    assert in_air / in_vacuum - 1.0 == pytest.approx(1.2e-3, abs=2e-4)


@pytest.mark.parametrize("outer", [860.0, np.array([998.0, 860.0])], ids=["one", "array"])
def test_no_difference_of_densities_no_drop(outer: object) -> None:
    for ask in (dripping.drop_volume_liquid, dripping.drop_diameter_liquid):
        with pytest.raises(Unphysical, match="neither sinks nor rises"):
            ask(*OIL, 2e-3, outer)
    with pytest.raises(Unphysical, match="neither sinks nor rises"):
        dripping.tip_diameter_for_drop_liquid(*OIL, 5e-3, outer)
    with pytest.raises(Unphysical, match="neither sinks nor rises"):
        dripping.interfacial_tension_drop_volume(860.0, 1e-7, 2e-3, outer)
    with pytest.raises(Unphysical, match="neither sinks nor rises"):
        dripping.drop_volume_flow(*OIL, 1e-9, 2e-3, outer, 1e-3)
