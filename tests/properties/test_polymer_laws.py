"""Coils and their laws over concentration."""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import records
from dropkit.errors import BadInput
from dropkit.properties.polymer_laws import Chain, entry_chain, entry_salts

laws = st.sampled_from(["martin", "huggins", "huggins_power"])
chains = st.builds(
    Chain,
    intrinsic=st.floats(0.01, 10.0),
    law=laws,
    constant=st.floats(0.0, 1.0),
    power=st.just(0.0),
    limit=st.just(5.0),
)


def entry(key: str, number: int = 1) -> records.PropertyRecord:
    return records.thickener_records()[key].properties["intrinsic_viscosity"][number - 1]


@given(chains, st.floats(1e-9, 1e-6))
def test_at_great_dilution_the_specific_viscosity_over_concentration_is_the_intrinsic(
    chain: Chain,
    x: float,
) -> None:
    c = x / chain.intrinsic
    # The law is one plus a small number: its rounding is the error here.
    assert chain.relative(c, 298.15) - 1.0 == pytest.approx(x, rel=2e-6, abs=4e-16)


@given(chains, st.floats(0.01, 5.0), st.floats(0.01, 5.0))
def test_more_polymer_is_more_viscous(chain: Chain, one: float, two: float) -> None:
    low, high = sorted((one / chain.intrinsic, two / chain.intrinsic))
    assert chain.relative(low, 298.15) <= chain.relative(high, 298.15)


@given(chains, st.floats(0.05, 5.0))
def test_steepness_is_the_logarithmic_slope(chain: Chain, x: float) -> None:
    c, h = x / chain.intrinsic, 1e-5
    up, down = chain.relative(c * (1 + h), 298.15), chain.relative(c * (1 - h), 298.15)
    slope = (math.log(up) - math.log(down)) / (math.log1p(h) - math.log1p(-h))
    assert chain.steepness(c, 298.15) == pytest.approx(slope, rel=1e-5)


def test_a_power_of_the_intrinsic_viscosity_in_the_constant_counts_in_the_slope() -> None:
    one = Chain(0.05, "huggins_power", 0.2, 0.28, 1.0)
    other = Chain(0.05 * 1.0001, "huggins_power", 0.2, 0.28, 1.0)
    c = 12.0
    slope = math.log(other.relative(c, 298.15) / one.relative(c, 298.15)) / math.log(1.0001)
    assert one.steepness(c, 298.15) == pytest.approx(slope, rel=1e-3)


def test_huggins_and_martin_agree_to_second_order() -> None:
    martin = Chain(0.5, "martin", 0.35, 0.0, 5.0)
    huggins = Chain(0.5, "huggins", 0.35, 0.0, 5.0)
    for x in (0.02, 0.1):
        gap = martin.relative(x / 0.5, 298.15) - huggins.relative(x / 0.5, 298.15)
        assert gap == pytest.approx(0.5 * 0.35**2 * x**3, rel=0.05)


def test_arrays_are_the_same_as_floats() -> None:
    chain = entry_chain(entry("polyvinyl_alcohol"), 50.0, 0.0, None)
    T = np.array([290.0, 303.15, 320.0])
    for values, one in (
        (chain.intrinsic_at(T), chain.intrinsic_at),
        (chain.relative(5.0, T), lambda t: chain.relative(5.0, t)),
    ):
        assert values == pytest.approx([one(float(t)) for t in T], rel=1e-14)


def test_relations_take_grams_per_mole() -> None:
    # Kawaguchi et al. 1997, abstract: [eta] = 4.33e-4 Mw^0.679 dL/g.
    chain = entry_chain(entry("poly_ethylene_oxide", 2), 1000.0, 0.0, None)
    assert chain.intrinsic == pytest.approx(0.1 * 4.33e-4 * 1e6**0.679, rel=1e-12)
    with pytest.raises(BadInput, match="needs a molar mass"):
        entry_chain(entry("poly_ethylene_oxide"), None, 0.0, None)


def test_poly_vinyl_alcohol_shrinks_with_warmth_as_its_source_says() -> None:
    # Pritchard 1970 as coded by Flanagan: 7 % more for 10 K less, 4.53e-4 M^0.64 dL/g at 30 degC.
    chain = entry_chain(entry("polyvinyl_alcohol"), 50.0, 0.0, None)
    assert chain.intrinsic_at(303.15) == pytest.approx(0.1 * 4.53e-4 * 50000**0.64, rel=1e-12)
    assert chain.intrinsic_at(293.15) / chain.intrinsic_at(303.15) == pytest.approx(1.07, rel=1e-12)
    assert "[eta] in dL/g" in chain.describe()


def test_between_salt_concentrations_the_logarithm_is_joined() -> None:
    cmc = entry("sodium_carboxymethylcellulose")
    low, high = (entry_chain(cmc, 337.5, salt, None) for salt in (50.0, 200.0))
    middle = entry_chain(cmc, 337.5, 100.0, None)
    assert middle.intrinsic == pytest.approx(math.sqrt(low.intrinsic * high.intrinsic), rel=1e-12)
    assert middle.constant == pytest.approx(0.5 * (low.constant + high.constant), rel=1e-12)
    first, last = entry_salts(cmc)
    assert (first, last) == pytest.approx((0.9 * 5.4, 1.1 * 2000.0))
    # Beyond the ends, within the leeway, the end itself serves.
    assert entry_chain(cmc, 337.5, first, None).intrinsic == pytest.approx(1.996)


def test_an_own_intrinsic_viscosity_keeps_the_law_only() -> None:
    chain = entry_chain(entry("polyvinyl_alcohol"), None, 0.0, 0.06)
    assert chain.intrinsic_at(283.15) == chain.intrinsic_at(313.15) == 0.06
    assert chain.law == "huggins_power"
