"""Pure liquids: names, look-ups, ranges, cautions."""

from __future__ import annotations

import pickle
import subprocess
import sys

import numpy as np
import pandas as pd
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import (
    AmbiguousName,
    BadInput,
    DropkitError,
    MissingProperty,
    OutOfRange,
    RangeWarning,
    RecalledWarning,
    UnitError,
    UnknownName,
    Unphysical,
)
from dropkit.properties.property_words import PROPERTIES

KEYS = list(dk.liquids().query("kind == 'liquid'").index)


def test_water_against_iapws_check_values():
    # IAPWS R6-95 and R12-08 at 298.15 K and 1 atm, R1-76 at 293.15 K (the
    # formulations computed with an independent library). The record is the saturated liquid's: 0.004 % less dense.
    water = dk.liquid("water")
    assert water.density(298.15) == pytest.approx(997.047, rel=1e-4)
    assert water.viscosity(298.15) == pytest.approx(889.9e-6, rel=1e-3)
    assert water.surface_tension(293.15) == pytest.approx(72.74e-3, rel=1e-4)


@pytest.mark.parametrize("name", ["water", "DI water", "Water", "7732-18-5", "H2O"])
def test_names(name):
    assert dk.liquid(name).key == "water"


@pytest.mark.parametrize(
    ("name", "error", "says"),
    [
        ("propanol", AmbiguousName, "2-propanol"),
        ("glicerol", UnknownName, "glycerol"),
        ("unobtainium", UnknownName, "unobtainium"),
        ("", UnknownName, ""),
        (7, BadInput, "7"),
        (None, BadInput, "None"),
    ],
)
def test_names_that_fail(name, error, says):
    with pytest.raises(error) as caught:
        dk.liquid(name)
    assert says in str(caught.value)


@pytest.mark.parametrize("key", KEYS)
def test_scalars_arrays_series_and_units_agree(key):
    fluid = dk.liquid(key)
    for prop in fluid.available():
        look = getattr(fluid, prop)
        limits = fluid.range(prop)
        kelvin = np.linspace(limits.low, limits.high, 7)
        if fluid.grade(prop) == "recalled":
            with pytest.warns(RecalledWarning, match="memory"):
                look(float(kelvin[3]))  # warns once
        singles = [look(float(t)) for t in kelvin]
        assert all(type(value) is float for value in singles)
        assert np.allclose(look(kelvin), singles, rtol=1e-13, atol=0.0)
        assert look(kelvin.reshape(7, 1)).shape == (7, 1)
        series = look(pd.Series(kelvin, index=list("abcdefg")))
        assert list(series.index) == list("abcdefg")
        assert np.allclose(series, singles, rtol=1e-13, atol=0.0)
        celsius = look((float(kelvin[3]) - 273.15, "degC"))
        bare = celsius.to_base_units().magnitude if hasattr(celsius, "magnitude") else celsius
        assert bare == pytest.approx(singles[3], rel=1e-9)
        assert type(look(np.float64(kelvin[3]))) is float
        assert type(look(np.array(kelvin[3]))) is float


@pytest.mark.filterwarnings("ignore::dropkit.errors.RecalledWarning")
@pytest.mark.parametrize("key", KEYS)
def test_nan_comes_out_as_nan(key):
    fluid = dk.liquid(key)
    if "density" not in fluid.available():
        with pytest.raises(MissingProperty, match="density"):
            fluid.density(float("nan"))
        return
    middle = 0.5 * (fluid.range("density").low + fluid.range("density").high)
    assert np.isnan(fluid.density(float("nan")))
    found = fluid.density(np.array([middle, np.nan]))
    assert np.isfinite(found[0])
    assert np.isnan(found[1])
    assert np.isnan(fluid.density(np.full(3, np.nan))).all()


def test_a_unit_gives_a_unit_and_si_gives_si():
    water = dk.liquid("water")
    quantity = water.viscosity("20 degC")
    assert str(quantity.units) == "millipascal * second"
    assert quantity.magnitude == pytest.approx(1.0016, rel=2e-3)  # IAPWS R12-08
    assert water.viscosity(293.15) == pytest.approx(1.0016e-3, rel=2e-3)


@pytest.mark.parametrize(
    ("temperature", "error", "says"),
    [
        (25, OutOfRange, "kelvin expected"),
        (25.0, OutOfRange, "298.15"),
        (900.0, OutOfRange, "outside="),
        (-3.0, Unphysical, "positive"),
        (0.0, Unphysical, "positive"),
        (float("inf"), Unphysical, "finite"),
        (True, BadInput, "True"),
        (3j, BadInput, "complex"),
        ("25 mPa*s", UnitError, "temperature"),
        ("25 C", UnitError, "degC"),
        ("25,5 degC", BadInput, "25.5"),
        (np.array(["a"]), BadInput, ""),
        (None, BadInput, "None"),
        ({}, BadInput, ""),
    ],
)
def test_temperatures_that_fail(temperature, error, says):
    with pytest.raises(error) as caught:
        dk.liquid("water").density(temperature)
    assert says in str(caught.value)


def test_the_range_policy():
    water = dk.liquid("water")
    high = water.range("density").high
    kelvin = np.array([300.0, high + 5.0, high + 9.0])
    with pytest.raises(OutOfRange, match=r"2 of 3 .*\[1\]"):
        water.density(kelvin)
    with pytest.warns(RangeWarning, match="2 of 3"):
        warned = water.density(kelvin, outside="warn")
    assert np.isfinite(warned).all()
    nan = water.density(kelvin, outside="nan")
    assert list(np.isnan(nan)) == [False, True, True]
    assert np.array_equal(water.density(kelvin, outside="allow"), warned)
    assert np.isnan(water.density(high + 5.0, outside="nan"))
    with pytest.raises(BadInput, match="allow"):
        water.density(300.0, outside="ignore")


def test_allow_never_goes_below_half_the_lowest_temperature():
    water = dk.liquid("water")
    low = water.range("viscosity").low
    with pytest.warns(dk.errors.DropkitWarning, match="NaN"):
        assert np.isnan(water.viscosity(0.49 * low, outside="allow"))
    with pytest.warns(dk.errors.DropkitWarning, match="1 value"):
        found = water.viscosity(np.array([0.49 * low, 300.0]), outside="allow")
    assert list(np.isnan(found)) == [True, False]


def test_input_is_never_changed():
    kelvin = np.array([300.0, 310.0])
    dk.liquid("water").viscosity(kelvin)
    assert list(kelvin) == [300.0, 310.0]


def test_missing_property_says_what_there_is():
    ethanol = dk.liquid("ethanol")
    with pytest.raises(UnknownName, match="viscosity"):
        ethanol.trail("viscocity")
    missing = [prop for prop in PROPERTIES if prop not in ethanol.available()]
    for prop in missing:
        with pytest.raises(MissingProperty, match="with_values"):
            getattr(ethanol, prop)(300.0)


def test_phase_cautions():
    water = dk.liquid("water")
    assert any("supercooled" in text for text in dk.liquid("glycerol").at("5 degC").cautions)
    hot = [text for text in water.at(380.0).cautions if "needs p >=" in text]
    assert hot
    assert "1.29 bar" in hot[0]  # IAPWS: 128.85 kPa at 380 K
    mild = water.at("20 degC").cautions
    assert not any("supercooled" in text or "needs p" in text for text in mild)


def test_flash_point_and_static_cautions():
    heptane = dk.liquid("n-heptane")
    assert any("flash point" in text and "closed" in text for text in heptane.cautions)
    assert any("static accumulator" in text for text in heptane.cautions)
    assert not any("static accumulator" in text for text in dk.liquid("water").cautions)


def test_metal_says_oxide():
    metals = dk.liquids().query("family == 'metal'").index
    assert len(metals) >= 1
    for key in metals:
        assert any("oxide" in text for text in dk.liquid(key).cautions)


def test_pickle_into_a_process_without_dropkit(tmp_path):
    fluid = dk.liquid("ethanol")
    fluid.viscosity(300.0)
    path = tmp_path / "fluid.pickle"
    path.write_bytes(pickle.dumps(fluid))
    code = f"import pickle; print(pickle.load(open({str(path)!r}, 'rb')).viscosity(300.0))"
    done = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True, check=True)
    assert float(done.stdout) == fluid.viscosity(300.0)


def test_equality_and_hash():
    assert dk.liquid("IPA") == dk.liquid("2-propanol")
    assert len({dk.liquid("IPA"), dk.liquid("2-propanol")}) == 1


def test_display_has_a_plain_twin():
    fluid = dk.liquid("acetone")
    assert "surface_tension" in repr(fluid)
    assert "<table>" in fluid._repr_html_()
    assert fluid.grade("density") in repr(fluid)


def test_cite_lists_every_source():
    text = dk.cite(dk.liquid("water"))
    assert "IAPWS" in text
    assert len(text.splitlines()) == len(dk.liquid("water").sources)


@pytest.mark.filterwarnings("ignore::dropkit.errors.RecalledWarning")
@given(
    st.sampled_from(KEYS),
    st.one_of(
        st.floats(),
        st.text(max_size=12),
        st.integers(),
        st.booleans(),
        st.lists(st.floats(), max_size=4),
        st.none(),
    ),
    st.sampled_from(["raise", "nan"]),
)
def test_anything_gives_a_number_or_an_error_of_ours(key, temperature, outside):
    try:
        found = dk.liquid(key).viscosity(temperature, outside=outside)
    except DropkitError:
        return
    value = np.asarray(found.magnitude if hasattr(found, "magnitude") else found)
    kelvin = np.asarray(temperature if not isinstance(temperature, str) else 300.0, dtype=float)
    assert value.shape == kelvin.shape
    assert not np.isinf(value).any()
    if outside == "raise":
        assert np.array_equal(np.isnan(value), np.isnan(kelvin))


@pytest.mark.filterwarnings("ignore::dropkit.errors.RecalledWarning")
@given(st.sampled_from(KEYS), st.floats(0.0, 1.0), st.floats(0.0, 1.0))
def test_viscosity_and_surface_tension_fall_with_temperature(key, a, b):
    fluid = dk.liquid(key)
    for prop in ("viscosity", "surface_tension"):
        blocks = fluid.record.properties.get(prop, ())
        if not blocks:
            continue
        limits = fluid.range(prop)
        low, high = (limits.low + x * (limits.high - limits.low) for x in sorted((a, b)))
        # Where one block gives way to the next, a step within their uncertainties is allowed.
        step = 2.0 * sum(block.uncertainty for block in blocks) if len(blocks) > 1 else 1e-12
        look = getattr(fluid, prop)
        assert look(high) <= look(low) * (1.0 + step)
