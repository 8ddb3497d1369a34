"""The band in which growth keeps a share of its maximum, for each relation in vacuum."""

from __future__ import annotations

import math
from typing import Any

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy.optimize import brentq
from scipy.special import iv

from dropkit.errors import DropkitWarning, Unphysical
from dropkit.models import jet

shares = st.one_of(st.floats(0.01, 0.999), st.sampled_from([0.5, 0.8, 0.95]))
powers = st.floats(-6, 6)
FORMS = {
    "longwave": (
        jet.growth_band_viscous_longwave,
        jet.growth_rate_viscous_longwave,
        jet.maximum_growth_viscous_longwave,
        jet.most_unstable_wavelength_viscous_longwave,
    ),
    "full": (
        jet.growth_band_viscous_full,
        jet.growth_rate_viscous_full,
        jet.maximum_growth_viscous_full,
        jet.most_unstable_wavelength_viscous_full,
    ),
}
every_form = pytest.mark.parametrize("form", FORMS)


def test_inviscid_band_by_another_root_finder() -> None:
    def squared(x: float) -> float:
        return float(x * (1 - x * x) * iv(1, x) / iv(0, x))

    aim = 0.64 * 0.343338701861**2  # the maximum [C]
    low = brentq(lambda x: squared(x) - aim, 0.01, 0.69, xtol=1e-14)
    high = brentq(lambda x: squared(x) - aim, 0.70, 0.9999, xtol=1e-14)
    band = jet.growth_band_inviscid(1.0)
    assert band.longest == pytest.approx(math.pi / low, rel=1e-11)
    assert band.shortest == pytest.approx(math.pi / high, rel=1e-11)
    # 3.5 to 7 jet diameters is the band commonly quoted (Schneider & Hendricks 1964 [M]).
    assert band.shortest == pytest.approx(3.5, abs=0.05)
    assert band.longest == pytest.approx(7.0, abs=0.2)


@given(shares)
def test_growth_at_the_ends_of_the_inviscid_band(share: float) -> None:
    most = jet.maximum_growth_inviscid(1.0, 1.0, 2.0)
    for wave in jet.growth_band_inviscid(2.0, share=share):
        growth = jet.growth_rate_inviscid(1.0, 1.0, 2.0, wave)
        assert growth == pytest.approx(share * most, rel=1e-11)


@every_form
@given(powers, shares)
def test_growth_at_the_ends(form: str, power: float, share: float) -> None:
    band, rate, maximum, fastest = FORMS[form]
    liquid = (1.0, 10.0**power, 1.0, 2.0)
    shortest, longest = band(*liquid, share=share)
    assert shortest < fastest(*liquid) < longest
    for wave in (shortest, longest):
        # At the short end of a small share growth falls steeply to 0.
        assert rate(*liquid, wave) == pytest.approx(share * maximum(*liquid), rel=1e-11)


@every_form
@given(powers)
def test_the_whole_maximum_is_one_wave(form: str, power: float) -> None:
    band, _, _, fastest = FORMS[form]
    liquid = (1.0, 10.0**power, 1.0, 2.0)
    for wave in band(*liquid, share=1.0):
        assert wave == pytest.approx(fastest(*liquid), rel=1e-5)  # a maximum is flat


@given(st.floats(-4, 4), st.floats(0.5, 0.9))
def test_a_larger_share_is_a_narrower_band_inside(power: float, share: float) -> None:
    liquid = (1.0, 10.0**power, 1.0, 2.0)
    wide = jet.growth_band_viscous_full(*liquid, share=share)
    narrow = jet.growth_band_viscous_full(*liquid, share=share + 0.05)
    assert wide.shortest < narrow.shortest < narrow.longest < wide.longest


@given(st.floats(0.05, 0.99))
def test_the_full_band_goes_over_into_the_other_two(share: float) -> None:
    thin = jet.growth_band_viscous_full(1.0, 1e-13, 1.0, 2.0, share=share)
    assert thin == pytest.approx(jet.growth_band_inviscid(2.0, share=share), rel=1e-10)
    thick = jet.growth_band_viscous_full(1.0, 1e9, 1.0, 2.0, share=share)
    longwave = jet.growth_band_viscous_longwave(1.0, 1e9, 1.0, 2.0, share=share)
    # Its long end is a long wave, its short end is none: there the two differ by up to 0.6 %.
    assert thick.longest == pytest.approx(longwave.longest, rel=1e-8)
    assert thick.shortest == pytest.approx(longwave.shortest, rel=0.006)


@every_form
def test_arrays_give_what_floats_give(form: str) -> None:
    band: Any = FORMS[form][0]
    oh, share = 10.0 ** np.linspace(-5, 5, 41)[:, None], np.array([0.3, 0.8, 0.99])
    found = band(1.0, oh, 1.0, 2.0, share=share)
    for end in (0, 1):
        assert found[end].shape == (41, 3)
        for i, j in ((0, 0), (20, 1), (40, 2), (13, 0)):
            single = band(1.0, float(oh[i, 0]), 1.0, 2.0, share=float(share[j]))
            assert found[end][i, j] == pytest.approx(single[end], rel=1e-13)


def test_shares_that_are_none() -> None:
    with pytest.raises(Unphysical):
        jet.growth_band_inviscid(1.0, share=1.2)
    with pytest.warns(DropkitWarning, match="no finite value"):
        assert math.isnan(jet.growth_band_inviscid(1.0, share=0.0)[1])
    asked = jet.growth_band_inviscid("1 m", share="80 %")
    assert asked.longest.to("m").magnitude == pytest.approx(jet.growth_band_inviscid(1.0).longest)
