"""Two liquids in contact: values, forms of input, what is refused, what stands behind."""

from __future__ import annotations

import contextlib
import json
import math
import pickle
import re
import warnings
from collections.abc import Iterator
from pathlib import Path
from typing import Any

import numpy as np
import pandas as pd
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit import records
from dropkit.errors import (
    AmbiguousName,
    BadInput,
    DropkitError,
    DropkitWarning,
    MissingProperty,
    NotALiquid,
    OutOfRange,
    RangeWarning,
    RecalledWarning,
    UnitError,
    UnknownName,
)
from dropkit.properties.interfacial import LiquidPair
from dropkit.provenance import Trail

PAIRS = records.interfaces()
PAGE = Path(__file__).parents[2] / "docs" / "interfaces.md"


@contextlib.contextmanager
def quietly() -> Iterator[None]:
    """Without the warning of records from memory, which has a test of its own."""
    with warnings.catch_warnings():
        warnings.simplefilter("ignore", RecalledWarning)
        yield


# Second-hand copies that were seen of "Surface-tension values" after Adamson and Gast 1997,
# 20 degC, and of the works named [N/m]. A pair is tested as soon as its liquids are there.
PUBLISHED = [
    ("mercury", "water", 293.15, 0.415, 0.0),
    ("ethanol", "mercury", 293.15, 0.389, 0.0),
    ("ethyl_acetate", "water", 293.15, 0.0068, 0.0),
    ("1-butanol", "water", 293.15, 0.0018, 0.0),
    ("nitrobenzene", "water", 293.15, 0.0244, 0.0002),
    ("nitromethane", "water", 293.15, 0.0160, 0.0002),
    ("1-2-dichloroethane", "water", 293.15, 0.0305, 0.0003),
    ("propylene_carbonate", "water", 293.15, 0.0029, 0.0001),
    # As the guide on groundwater quotes Cohen et al. 1993, 20 to 25 degC.
    ("trichloroethylene", "water", 295.65, 0.0345, 0.0),
    ("tetrachloroethylene", "water", 295.65, 0.0444, 0.0),
    # As Montgomery 2007 quotes them; 1.2 mN/m apart, so each within two standard uncertainties.
    ("o-xylene", "water", 293.15, 0.03606, 0.0013),
    ("o-xylene", "water", 298.15, 0.0372, 0.0013),
    ("o-xylene", "water", 296.15, 0.0357, 0.0013),
]


@pytest.mark.parametrize(
    ("a", "b", "T", "value", "spread"), [row for row in PUBLISHED if row[:2] in PAIRS]
)
def test_published_values(a: str, b: str, T: float, value: float, spread: float) -> None:
    assert dk.interfacial_tension(a, b, T) == pytest.approx(value, rel=1e-9, abs=spread)


@pytest.mark.parametrize("pair", PAIRS, ids="__".join)
def test_no_interface_is_tighter_than_both_surfaces(pair: tuple[str, str]) -> None:
    # Were it so, the liquids would part and let air in; traces only lower it.
    known = dk.liquid_pair(*pair)
    T = 0.5 * (known.range().low + known.range().high)
    liquids = [dk.liquid(key) for key in pair]
    with quietly():
        surfaces = [
            liquid.surface_tension(T, outside="allow")
            for liquid in liquids
            if "surface_tension" in liquid.available()
        ]
        assert 0.0 < known.interfacial_tension(T) < max(surfaces)


@pytest.mark.parametrize("pair", PAIRS, ids="__".join)
def test_every_pair_says_what_it_rests_on(pair: tuple[str, str]) -> None:
    known = dk.liquid_pair(*pair)
    assert known.grade() in ("reference", "measured", "single", "recalled")
    spread = known.uncertainty()
    assert spread is not None
    assert 0.0 < spread < 0.25
    assert known.range().high - known.range().low <= 50.0
    assert known.sources
    assert all(key in dk.cite(known) for key in known.sources)
    assert any("traces" in text for text in known.cautions)


def test_the_order_and_the_form_of_the_liquids_do_not_matter() -> None:
    water, mercury = dk.liquid("water"), dk.liquid("mercury")
    values = {
        dk.interfacial_tension(a, b, 293.15)
        for a, b in [
            ("water", "mercury"),
            ("Quicksilver", "7732-18-5"),
            (water, mercury),
            (mercury, "DI water"),
        ]
    }
    assert values == {0.415}
    assert dk.liquid_pair("water", "mercury") == dk.liquid_pair(mercury, water)
    assert len({dk.liquid_pair("water", "mercury"), dk.liquid_pair(mercury, water)}) == 1
    assert dk.liquid_pair("water", "mercury") != dk.liquid_pair("ethanol", "mercury")


def test_every_form_of_temperature() -> None:
    pair = dk.liquid_pair("mercury", "water")
    assert type(pair.interfacial_tension(293.15)) is float
    assert type(pair.interfacial_tension(295)) is float
    asked = pair.interfacial_tension("20 degC")
    assert asked.m_as("N/m") == pytest.approx(0.415)
    assert f"{asked:~P}" == "415.0 mN/m"
    grid = pair.interfacial_tension(np.full((2, 3), 293.15))
    assert grid.shape == (2, 3)
    assert (grid == 0.415).all()
    several = pair.interfacial_tension(["20 degC", "21 degC"])
    assert several.m_as("N/m").tolist() == pytest.approx([0.415, 0.415])
    series = pd.Series([293.15, 295.0], index=["a", "b"])
    found = pair.interfacial_tension(series)
    assert found.index.tolist() == ["a", "b"]
    assert found.name == "interfacial_tension"
    assert math.isnan(pair.interfacial_tension(math.nan))
    assert pair.interfacial_tension(np.array([])).shape == (0,)


def test_nothing_is_extrapolated_unasked() -> None:
    pair = dk.liquid_pair("mercury", "water")
    with pytest.raises(OutOfRange, match=r"mercury / water.* 333.15 K .*288.15 to 298.15 K"):
        pair.interfacial_tension("60 degC")
    with pytest.raises(OutOfRange, match="1 of 2"):
        pair.interfacial_tension([293.15, 333.15])
    with pytest.raises(OutOfRange, match="in kelvin"):
        pair.interfacial_tension(20.0)
    values = pair.interfacial_tension([293.15, 333.15], outside="nan")
    assert values[0] == 0.415
    assert math.isnan(values[1])
    with pytest.warns(RangeWarning, match="333.15 K"):
        assert pair.interfacial_tension(333.15, outside="warn") == 0.415
    assert pair.interfacial_tension(333.15, outside="allow") == 0.415
    assert pair.uncertainty(333.15) is None
    assert "extrapolated" in pair.trail([293.15, 333.15]).cautions[-1]
    with pytest.raises(BadInput, match="outside"):
        pair.interfacial_tension(293.15, outside="clip")  # type: ignore[call-overload]
    with pytest.raises(UnitError, match="temperature"):
        pair.interfacial_tension("20 mN/m")


def test_the_trail_says_how_it_was_made() -> None:
    trail = dk.liquid_pair("water", "mercury").trail("20 degC")
    assert trail.quantity == "interfacial_tension"
    assert trail.subject == "mercury / water"
    assert trail.grade == "single"
    assert trail.uncertainty == 0.02
    assert trail.sources == ("AdamsonGast1997",)
    assert trail.assumptions == ("clean liquids, each saturated with the other",)
    assert any("oxide-free" in text for text in trail.cautions)
    assert Trail.from_dict(json.loads(json.dumps(trail.to_dict()))) == trail
    assert str(trail) == repr(dk.liquid_pair("water", "mercury"))
    assert "Adamson" in dk.cite(dk.liquid_pair("water", "mercury"))


def test_a_value_from_memory_warns_once() -> None:
    pair = dk.liquid_pair("toluene", "water")
    assert pair.grade() == "recalled"
    with pytest.warns(RecalledWarning, match="toluene / water rests on memory"):
        pair.interfacial_tension(293.15)
    with warnings.catch_warnings():
        warnings.simplefilter("error")
        pair.interfacial_tension(294.15)
    spread = pair.uncertainty()
    assert spread is not None
    assert spread >= 0.05


def test_liquids_that_mix_have_no_interface_and_nothing_is_estimated() -> None:
    with pytest.raises(MissingProperty, match="ethanol against water; they mix") as caught:
        dk.interfacial_tension("water", "ethanol", 293.15)
    assert "Nothing is estimated" in str(caught.value)
    assert len(caught.value.choices) == 3
    assert all(" / water" in choice for choice in caught.value.choices)


def test_an_unknown_pair_is_answered_with_the_nearest() -> None:
    with pytest.raises(MissingProperty, match="acetone against n-heptane") as caught:
        dk.liquid_pair("n-heptane", "acetone")
    assert "they mix" not in str(caught.value)
    assert caught.value.choices[0] == "n-heptane / water"
    with pytest.raises(MissingProperty) as nothing:
        dk.liquid_pair("acetone", "methanol")
    assert nothing.value.choices == ()


def test_what_is_no_pair_of_pure_liquids_is_refused() -> None:
    ink = dk.mixture({"glycerol": 0.3, "water": "rest"}, by="mass")
    with pytest.raises(MissingProperty, match="pure liquids"):
        dk.interfacial_tension(ink, "toluene", 293.15)
    own = dk.fluid("ours", density="1 kg/L", viscosity="1 mPa*s", surface_tension="30 mN/m")
    with pytest.raises(MissingProperty, match="of ours is not known"):
        dk.interfacial_tension("water", own, 293.15)
    with pytest.raises(BadInput, match="with itself"):
        dk.interfacial_tension("water", "DI water", 293.15)
    with pytest.raises(NotALiquid):
        dk.interfacial_tension("water", "NaCl", 293.15)
    with pytest.raises(UnknownName):
        dk.interfacial_tension("water", "no such liquid", 293.15)
    with pytest.raises(AmbiguousName):
        dk.interfacial_tension("water", "propanol", 293.15)


def test_a_pair_travels() -> None:
    pair = dk.liquid_pair("mercury", "water")
    again = pickle.loads(pickle.dumps(pair))
    assert isinstance(again, LiquidPair)
    assert again == pair
    assert again.interfacial_tension(293.15) == 0.415


def test_the_list_agrees_with_the_pairs() -> None:
    table = dk.liquid_pairs()
    assert list(zip(table["liquid_1"], table["liquid_2"], strict=True)) == list(PAIRS)
    for row in table.itertuples():
        pair = dk.liquid_pair(row.liquid_1, row.liquid_2)
        middle = 0.5 * (row.low + row.high)
        with quietly():
            assert pair.interfacial_tension(middle) == row.interfacial_tension
        assert (pair.range().low, pair.range().high) == (row.low, row.high)
        assert (pair.uncertainty(middle), pair.grade()) == (row.uncertainty, row.grade)


def test_the_page_shows_what_there_is() -> None:
    rows = re.findall(r"^\| (\S+) / (\S+) \| (.*) \|$", PAGE.read_text("utf-8"), re.MULTILINE)
    shown = {(a, b): rest.split(" | ") for a, b, rest in rows}
    held = {}
    for row in dk.liquid_pairs().itertuples():
        degrees = f"{row.low - 273.15:g} to {row.high - 273.15:g}"
        tension = f"{1e3 * row.interfacial_tension:.4g}"
        sources = ", ".join(dk.liquid_pair(row.liquid_1, row.liquid_2).sources)
        held[row.liquid_1, row.liquid_2] = [
            *(degrees, tension, f"{200 * row.uncertainty:.2g} %", row.grade, sources)
        ]
    assert shown == held


things = st.one_of(
    st.sampled_from(["water", "mercury", "toluene", "NaCl", "xylene", "", "ethanol"]),
    st.floats(),
    st.none(),
    st.booleans(),
    st.text(max_size=5),
    st.lists(st.text(max_size=3), max_size=2),
)
temperatures = st.one_of(
    st.floats(),
    st.floats(285.0, 300.0),
    st.sampled_from(["20 degC", "60 degC", "20", ""]),
    st.lists(st.floats(280.0, 310.0), max_size=3),
    st.complex_numbers(max_magnitude=1e3),
    st.booleans(),
    st.none(),
)


@given(things, things, temperatures, st.sampled_from(["raise", "warn", "nan", "allow"]))
def test_whatever_is_asked_a_value_or_an_error_of_dropkit(
    a: Any, b: Any, T: Any, outside: Any
) -> None:
    with warnings.catch_warnings():
        warnings.simplefilter("ignore", DropkitWarning)
        try:
            found = dk.interfacial_tension(a, b, T, outside=outside)
        except DropkitError:
            return
    values = np.asarray(getattr(found, "magnitude", found), dtype=float)
    assert not np.isinf(values).any()
    assert (values[~np.isnan(values)] > 0.0).all()
