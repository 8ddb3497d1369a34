"""Rate of dripping: conservation of volume, and the flow that counts as slow."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.models import dripping


@given(flow=st.floats(1e-12, 1e-6), volume=st.floats(1e-10, 1e-6))
def test_there_and_back(flow: float, volume: float) -> None:
    rate = dripping.drip_frequency(flow, volume)
    assert dripping.drip_flow(volume, rate) == pytest.approx(flow, rel=1e-14)
    assert rate * dripping.drip_interval(flow, volume) == pytest.approx(1.0, rel=1e-14)


def test_slow_is_a_minute_per_drop() -> None:
    volume = dripping.drop_volume_tip(998.2, 0.0727, 3e-3)
    slow = dripping.slow_drip_flow(volume)
    assert dripping.drip_interval(slow, volume) == pytest.approx(60.0)
    # Tate never took less than 40 s [S: Rayleigh's account].
    assert dripping.slow_drip_flow(volume, "40 s").to("m^3/s").magnitude == pytest.approx(
        1.5 * slow
    )


def test_counted_and_weighed_drops() -> None:
    """120 drops in a minute at 5.7 g/min of water: 47.5 mg each."""
    found = dripping.drip_flow("47.5 uL", "120 rpm")
    assert found.to("mL/min").magnitude == pytest.approx(5.7, rel=1e-12)
