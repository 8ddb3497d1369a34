"""`air`: its interface, ranges, units, arrays, and what its result can do."""

from __future__ import annotations

import json
import pickle
import warnings
from typing import Any

import numpy as np
import pandas as pd
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import (
    BadInput,
    DropkitError,
    DropkitWarning,
    MissingProperty,
    OutOfRange,
    RangeWarning,
    UnitError,
    UnknownName,
    Unphysical,
)
from dropkit.properties.gas_statements import STATEMENTS
from dropkit.records import source

EVERYTHING = tuple(STATEMENTS)


def test_room_air() -> None:
    room = dk.air(293.15, 101325.0, 0.5)
    # CIPM-2007 for 20 degC, 101325 Pa, 50 %: see test_humid_air for the formula
    assert room.density == pytest.approx(1.19930, rel=2e-5)
    assert room.dew_point - 273.15 == pytest.approx(9.27, abs=0.02)
    assert room.kinematic_viscosity == pytest.approx(room.viscosity / room.density, rel=1e-14)
    assert room.vapour_pressure == pytest.approx(room.water_mole_fraction * 101325.0)
    assert all(type(getattr(room, prop)) is float for prop in EVERYTHING)


def test_agrees_with_the_record_of_water() -> None:
    water = dk.liquid("water")
    for t in (283.15, 298.15, 323.15, 363.15):
        assert dk.air(t).saturation_vapour_pressure == pytest.approx(
            water.vapour_pressure(t), rel=3e-4
        )


def test_units_in_units_out() -> None:
    room = dk.air("68 degF", "1013.25 mbar", "50 %RH")
    assert room.density.to("g/L").magnitude == pytest.approx(1.1993, rel=1e-4)
    assert str(room.viscosity.units) == "micropascal * second"
    assert room.temperature.to("kelvin").magnitude == pytest.approx(293.15)
    assert room.dew_point.to("degC").magnitude == pytest.approx(9.27, abs=0.02)
    assert isinstance(room.water_mole_fraction, float)
    assert room.si().density == pytest.approx(1.1993, rel=1e-4)
    assert room.si().with_units().density == room.density
    mixed = dk.air(293.15, "1 bar")
    assert mixed.density.magnitude == pytest.approx(dk.air(293.15, 1e5).density)


def test_arrays_broadcast_and_scalars_stay_scalars() -> None:
    t = np.array([[280.0], [300.0]])
    many = dk.air(t, humidity=np.array([0.0, 0.4, 0.8]))
    for prop in EVERYTHING:
        value = getattr(many, prop)
        assert value.shape == (2, 3)
        for i, temperature in enumerate((280.0, 300.0)):
            for j, humidity in enumerate((0.0, 0.4, 0.8)):
                if prop == "dew_point" and humidity == 0.0:
                    assert np.isnan(value[i, j])
                    continue
                single = getattr(dk.air(temperature, 101325.0, humidity), prop)
                assert value[i, j] == pytest.approx(single, rel=1e-14)
    assert type(dk.air(np.array(300.0)).density) is float
    assert type(dk.air(np.float64(300.0)).density) is float
    with pytest.raises(ValueError, match="read-only"):
        many.density[0, 0] = 1.0
    with pytest.raises(BadInput, match="broadcast"):
        dk.air(np.ones(2) * 300.0, np.ones(3) * 1e5)


def test_series_keep_their_index() -> None:
    t = pd.Series([290.0, 300.0], index=["morning", "noon"])
    found = dk.air(t).density
    assert found.index.tolist() == ["morning", "noon"]
    assert found["noon"] == pytest.approx(dk.air(300.0).density)


def test_nan_gives_nan() -> None:
    found = dk.air([290.0, np.nan], humidity=[0.2, 0.2])
    for prop in EVERYTHING:
        assert np.isnan(getattr(found, prop)).tolist() == [False, True], prop


@pytest.mark.parametrize(
    ("case", "words"),
    [
        ({"temperature": 500.0}, "233.15 to 473.15 K"),
        ({"temperature": 300.0, "pressure": 2e6}, "pressure 2e\\+06 Pa"),
        ({"temperature": 400.0, "humidity": 0.1}, "humid air"),
        ({"temperature": [290.0, 500.0]}, "1 of 2"),
        ({"temperature": 25.0}, "kelvin expected"),
        ({"temperature": [25.0, 30.0]}, "kelvin expected"),
    ],
)
def test_outside_its_ranges(case: dict[str, Any], words: str) -> None:
    with pytest.raises(OutOfRange, match=words):
        dk.air(**case)
    blank = np.atleast_1d(dk.air(**case, outside="nan").density)
    assert np.isnan(blank[-1])
    if np.min(case["temperature"]) > 100.0:
        with pytest.warns(RangeWarning):
            warned = dk.air(**case, outside="warn")
        allowed = dk.air(**case, outside="allow")
        np.testing.assert_array_equal(warned.density, allowed.density)
        assert np.isfinite(allowed.density).all()


def test_allow_has_a_floor() -> None:
    assert np.isnan(dk.air([100.0, 120.0], outside="allow").density).tolist() == [True, False]


def test_each_property_keeps_its_own_range() -> None:
    hot = dk.air(450.0)
    assert hot.density > 0.0
    with pytest.raises(OutOfRange, match="vapour_diffusivity"):
        hot.vapour_diffusivity  # noqa: B018 # the access is what is tested
    assert np.isnan(dk.air(450.0, outside="nan").vapour_diffusivity)
    with pytest.warns(RangeWarning, match="vapour_diffusivity"):
        assert dk.air(450.0, outside="warn").vapour_diffusivity > 0.0


def test_more_water_than_pressure() -> None:
    with pytest.raises(Unphysical, match="more water"):
        dk.air(350.0, 2e4, 1.0)
    assert np.isnan(dk.air(350.0, 2e4, 1.0, outside="nan").density)
    steam = dk.air(350.0, 2e4, 0.45)  # nearly pure vapour at low pressure is no error
    assert 0.9 < steam.water_mole_fraction < 1.0


@pytest.mark.parametrize(
    ("case", "error"),
    [
        ({"temperature": -5.0}, Unphysical),
        ({"temperature": 300.0, "humidity": 50.0}, BadInput),
        ({"temperature": 300.0, "humidity": -0.1}, BadInput),
        ({"temperature": "3 m"}, UnitError),
        ({"temperature": 300.0, "pressure": "3 bar(g)"}, UnitError),
        ({"temperature": True}, BadInput),
        ({"temperature": 300.0, "outside": "clip"}, BadInput),
    ],
    ids=str,
)
def test_bad_input(case: dict[str, Any], error: type[Exception]) -> None:
    with pytest.raises(error):
        dk.air(**case)


def test_dry_air_has_no_dew_point() -> None:
    dry = dk.air(293.15)
    with pytest.raises(MissingProperty, match="dew point"):
        dry.dew_point  # noqa: B018 # the access is what is tested
    assert "dew_point" not in dry.available()
    assert dry.vapour_pressure == 0.0


def test_immutable() -> None:
    room = dk.air(293.15)
    with pytest.raises(AttributeError, match="immutable"):
        room.density = 1.0
    with pytest.raises(AttributeError, match="immutable"):
        del room.name
    original = np.array([290.0, 300.0])
    many = dk.air(original)
    original[0] = 0.0
    assert many.temperature[0] == 290.0


@pytest.mark.parametrize(
    "made",
    [
        dk.air(293.15, humidity=0.4),
        dk.air("20 degC", humidity=0.4),
        dk.air([290.0, np.nan, 310.0], humidity=[0.1, 0.2, 0.0]),
    ],
    ids=["si", "units", "array"],
)
def test_survives_json_and_pickle(made: Any) -> None:
    from_json = dk.air(290.0).from_dict(json.loads(json.dumps(made.to_dict())))
    for twin in (from_json, pickle.loads(pickle.dumps(made))):
        assert repr(twin) == repr(made)
        for prop in made.available():
            np.testing.assert_array_equal(getattr(twin.si(), prop), getattr(made.si(), prop))
    with pytest.raises(BadInput, match="no dict"):
        dk.air(290.0).from_dict({"kind": "State"})


def test_table_repr_and_html() -> None:
    room = dk.air("20 degC", humidity=0.5)
    table = room.table()
    assert table.index.tolist() == list(EVERYTHING)
    assert table.loc["viscosity", "unit"] == "uPa*s"
    assert table.loc["dew_point", "value"] == pytest.approx(9.27, abs=0.02)
    density = table.loc["density"]
    assert density["uncertainty_95"] == pytest.approx(2 * density["uncertainty"] * density["value"])
    assert not table[["value", "uncertainty", "uncertainty_95"]].isna().to_numpy().any()
    assert "50 % relative humidity" in repr(room)
    assert all(prop in repr(room) for prop in EVERYTHING)
    html = room._repr_html_()
    assert "<table>" in html
    assert "Wilke" in html
    hot = dk.air(450.0)
    assert np.isnan(hot.table().loc["vapour_diffusivity", "value"])
    assert "out of range" in hot.table().loc["vapour_diffusivity", "method"]
    assert "vapour_diffusivity" in repr(hot)


def test_trails_and_sources() -> None:
    dry, humid = dk.air(293.15), dk.air(333.15, humidity=0.9)
    for gas in (dry, humid):
        for prop in gas.available():
            trail = gas.trail(prop)
            assert trail.quantity == prop
            assert trail.uncertainty is not None
            assert 0.0 < trail.uncertainty < 0.1
            assert trail.range
            assert str(trail)
        assert all(source(key).citation for key in gas.sources)
        assert len(dk.cite(gas).splitlines()) == len(gas.sources)
    # A prediction is called one, and only where it enters.
    assert dry.grade("viscosity") == "single"
    assert humid.grade("viscosity") == "estimated"
    assert humid.grade("density") == "reference"
    assert humid.grade() == "estimated"
    assert dry.cautions == ()
    assert any("prediction" in text for text in humid.cautions)
    assert any("400 ppm" in text for text in dry.assumptions)
    assert humid.uncertainty("viscosity") > dry.uncertainty("viscosity")
    with pytest.raises(UnknownName, match="viscosity"):
        dry.trail("viscosty")


conditions = (st.floats(233.15, 373.15), st.floats(9e4, 1e6), st.floats(0.0, 0.85))


@given(*conditions)
def test_invariants(temperature: float, pressure: float, humidity: float) -> None:
    humid = dk.air(temperature, pressure, humidity, outside="nan")
    dry = dk.air(temperature, pressure)
    assert 0.0 <= humid.water_mole_fraction <= 1.0
    assert humid.density <= dry.density * (1 + 1e-12)
    assert humid.heat_capacity >= dry.heat_capacity * (1 - 1e-12)
    assert humid.molar_mass <= dry.molar_mass
    # A mean free path goes as one over the pressure, but for the small rise of viscosity.
    half = dk.air(temperature, 0.5 * pressure)
    assert half.mean_free_path / dry.mean_free_path == pytest.approx(2.0, rel=0.03)
    more = dk.air(temperature, pressure, min(1.0, humidity + 0.1))
    if humidity > 1e-3:
        assert more.dew_point > humid.dew_point
    assert more.vapour_pressure > humid.vapour_pressure


anything = st.one_of(
    st.floats(allow_nan=True, allow_infinity=True),
    st.text(max_size=8),
    st.lists(st.floats(), max_size=3),
    st.none(),
    st.booleans(),
)


@given(anything, anything, anything, st.sampled_from(["raise", "nan", "allow"]))
def test_only_own_exceptions(t: Any, p: Any, h: Any, outside: Any) -> None:
    with warnings.catch_warnings(record=True) as caught:
        warnings.simplefilter("always")
        try:
            made = dk.air(t, p, h, outside=outside)
        except DropkitError:
            return
        values = [made.density, made.viscosity, made.mean_free_path, made.water_mole_fraction]
    assert all(issubclass(warning.category, DropkitWarning) for warning in caught)
    assert outside == "allow" or not caught
    for value in values:
        assert not np.isinf(np.asarray(getattr(value, "magnitude", value))).any()
