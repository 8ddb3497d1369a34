"""Merged drops, and the scatter of natural drops against what was measured."""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import OutOfRange
from dropkit.models import jet
from dropkit.published_rows import published_file
from dropkit.records import data_dir


@given(st.floats(1e-6, 1e-2), st.floats(1.0, 1000.0))
def test_merging_keeps_volume(size: float, count: float) -> None:
    merged = jet.merged_drop_diameter(size, count)
    assert merged**3 == pytest.approx(count * size**3, rel=1e-12)
    assert jet.drops_to_merge(size, merged) == pytest.approx(count, rel=1e-12)


def test_a_merged_stream_is_one_of_a_lower_frequency() -> None:
    # n drops of one flow: as if the frequency were an n-th
    one = jet.drop_diameter_from_flow(5e-8, 6e4)
    assert jet.merged_drop_diameter(one, 4) == pytest.approx(
        jet.drop_diameter_from_flow(5e-8, 1.5e4), rel=1e-13
    )


def test_scatter_from_the_width_of_the_growth_curve() -> None:
    """The bell curve is the amplified power itself, summed over waves [C]; C large, so that it is."""
    liquid, d, constant = (1.0, 0.1, 1.0), 1.0, 400.0
    wave = jet.most_unstable_wavelength_viscous_longwave(*liquid, d)
    x = np.linspace(0.8, 1.2, 20_001)
    growth = jet.growth_rate_viscous_longwave(*liquid, d, wave / x, outside="allow")
    power = np.exp(2.0 * constant * (growth / growth.max() - 1.0))
    size = x ** (-1.0 / 3.0)
    mean = (power * size).sum() / power.sum()
    spread = math.sqrt((power * (size - mean) ** 2).sum() / power.sum()) / mean
    found = jet.least_drop_scatter_natural(*liquid, d, constant=constant)
    assert found == pytest.approx(spread, rel=5e-3)


def test_measured_scatter_is_larger() -> None:
    """Asset & Bales 1951 [S2]: 8.5 to 33 %, two to nine times the least."""
    found = []
    rows = published_file(data_dir() / "published" / "jets" / "AssetBales1951_drops.csv")
    for row in rows:
        ohnesorge = math.sqrt(float(row["We_d"])) / float(row["Re_d"])
        least = jet.least_drop_scatter_natural(1.0, ohnesorge, 1.0, 1.0)
        assert 0.037 < least < 0.0401
        found.append(0.01 * float(row["drop_sd_percent"]) / least)
    assert len(found) == 5
    assert min(found) == pytest.approx(2.3, abs=0.05)
    assert max(found) == pytest.approx(8.8, abs=0.05)


def test_scatter_range_and_scaling() -> None:
    case = (1000.0, 1e-3, 0.07, 1e-4)
    four = jet.least_drop_scatter_natural(*case, constant=40.0)
    assert jet.least_drop_scatter_natural(*case) == pytest.approx(2.0 * four, rel=1e-12)
    with pytest.raises(OutOfRange, match="Ohnesorge"):
        jet.least_drop_scatter_natural(1000.0, 0.1, 0.05, 1e-4)
