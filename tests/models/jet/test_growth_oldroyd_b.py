"""Start of growth on an elastic jet: it solves its equation, and its limits are Weber's."""

from __future__ import annotations

import math
from typing import Any

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers
from dropkit.errors import OutOfRange
from dropkit.models import jet

start = jet.growth_start_oldroyd_b
fastest = jet.most_unstable_start_oldroyd_b
powers = st.floats(-4, 3)
shares = st.floats(0.0, 1.0)
times = st.floats(-4, 5)
# rho = gamma = a = 1: viscosity is the Ohnesorge number, relaxation time the Deborah number.


def unit(x: float, oh: float, share: float, deborah: float) -> Any:
    return start(1.0, oh, share * oh, 1.0, deborah, 2.0, 2.0 * math.pi / x)


@given(st.floats(0.01, 0.999), powers, shares, times)
def test_solves_its_own_equation(x: float, power: float, share: float, time: float) -> None:
    oh, de = 10.0**power, 10.0**time
    w = unit(x, oh, share, de).growth_rate
    thickness = oh * (share + (1.0 - share) / (1.0 + de * w))
    drive = 0.5 * x * x * (1.0 - x * x)
    assert w * w + 3.0 * thickness * x * x * w == pytest.approx(drive, rel=1e-11)


@given(st.floats(0.01, 0.999), powers, st.floats(0.0, 0.99), times)
def test_faster_than_the_viscosity_at_rest_says_slower_than_the_solvent(
    x: float, power: float, share: float, time: float
) -> None:
    oh, wave = 10.0**power, 2.0 * math.pi / x
    w = unit(x, oh, share, 10.0**time).growth_rate
    at_rest = jet.growth_rate_viscous_longwave(1.0, oh, 1.0, 2.0, wave)
    solvent = jet.growth_rate_viscous_longwave(1.0, max(share, 1e-12) * oh, 1.0, 2.0, wave)
    assert at_rest * (1 - 1e-11) <= w <= solvent * (1 + 1e-9)


@given(st.floats(0.05, 0.95), powers, st.floats(0.01, 1.0))
def test_without_memory_and_with_endless_memory_it_is_webers(
    x: float, power: float, share: float
) -> None:
    oh, wave = 10.0**power, 2.0 * math.pi / x
    weber = jet.growth_rate_viscous_longwave
    assert unit(x, oh, share, 1e-12).growth_rate == pytest.approx(
        weber(1.0, oh, 1.0, 2.0, wave), rel=1e-10
    )
    # With endless memory the polymer is a spring, and a weak one: mu_p over lambda is nothing.
    assert unit(x, oh, share, 1e18).growth_rate == pytest.approx(
        weber(1.0, share * oh, 1.0, 2.0, wave), rel=1e-9
    )


@given(powers, st.floats(0.0, 1.0), times)
def test_the_fastest_start(power: float, share: float, time: float) -> None:
    oh, de = 10.0**power, 10.0**time
    found = fastest(1.0, oh, share * oh, 1.0, de, 2.0)
    x = 2.0 * math.pi / found.wavelength
    there = unit(x, oh, share, de)
    assert there.growth_rate == pytest.approx(found.growth_rate, rel=1e-9)
    for near in (0.99, 1.01):
        assert unit(near * x, oh, share, de).growth_rate <= found.growth_rate * (1 + 1e-12)
    assert (found.drain_time, found.deborah) == (there.drain_time, there.deborah)


def test_drain_time_and_deborah_number() -> None:
    found = start(1000.0, 5e-3, 1e-3, 0.06, 1e-3, 100e-6, 480e-6)
    assert found.drain_time == pytest.approx(3e-3)  # 3 relaxation times per factor e of radius
    assert found.deborah == pytest.approx(numbers.deborah(1000.0, 0.06, 1e-3, 50e-6))


def test_a_thread_loses_a_factor_e_in_the_drain_time() -> None:
    # Entov & Hinch 1997: R/R0 = (G R0/(2 gamma))^(1/3) exp(-t/(3 lambda)); 1e-3 and t = 3 lambda give
    # D/D0 = 0.03678794412 [C].
    drain = start(1000.0, 5e-3, 1e-3, 0.06, 1e-3, 100e-6, 480e-6).drain_time
    assert 1e-3 ** (1 / 3) * math.exp(-3e-3 / drain) == pytest.approx(0.03678794412, rel=1e-9)


def test_cautions() -> None:
    calm, wild = jet.elastic_cautions(0.5), jet.elastic_cautions(np.array([0.5, np.nan, 22.0]))
    assert wild[:3] == calm
    assert "no breakup length" in calm[0]
    assert "nozzle" in calm[2]
    assert "beads on a string" in wild[3]
    assert len(calm) == 3


def test_nothing_here_gives_a_length_of_breakup() -> None:
    results = (jet.ElasticStart, jet.FastestElasticStart)
    assert not any("breakup" in word for each in results for word in each._fields)


def test_outside_its_ranges() -> None:
    liquid = (1000.0, 5e-3, 1e-3, 0.06, 1e-3, 100e-6)
    with pytest.raises(OutOfRange, match="reduced wavenumber"):
        start(*liquid, 300e-6)
    assert start(*liquid, 300e-6, outside="allow").growth_rate == 0.0
    with pytest.raises(OutOfRange, match="viscosity of the solvent"):
        start(1000.0, 5e-3, 6e-3, 0.06, 1e-3, 100e-6, 480e-6)
