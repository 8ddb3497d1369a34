"""Frozen states: values, units, trails, tables, JSON, pickling."""

from __future__ import annotations

import json
import pickle

import numpy as np
import pandas as pd
import pint
import pytest

import dropkit as dk
from dropkit.errors import BadInput, MissingProperty, OutOfRange
from dropkit.properties.state import State


@pytest.fixture
def ink():
    return dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass")


def test_state_remembers_how_it_was_asked(ink):
    with_units = ink.at("32 degC")
    assert with_units.viscosity.magnitude == pytest.approx(
        1e3 * ink.at(305.15).viscosity, rel=1e-12
    )
    assert type(ink.at(305.15).viscosity) is float
    assert type(with_units.si().viscosity) is float
    assert str(ink.at(305.15).with_units().surface_tension.units) == "millinewton / meter"


def test_results_live_in_the_registry_of_the_quantity_that_asked(ink):
    mine = pint.UnitRegistry()
    state = ink.at(mine.Quantity(32.0, "degC"))
    assert (state.viscosity + mine.Quantity(1.0, "mPa*s")).magnitude > 1.0
    back = pickle.loads(pickle.dumps(state))  # a registry does not travel
    assert back.viscosity.magnitude == state.viscosity.magnitude
    assert len(ink.viscosity(["20 degC", "30 degC"]).magnitude) == 2
    assert ink.viscosity((np.array([20.0, 30.0]), "degC")).shape == (2,)


def test_values_are_frozen(ink):
    state = ink.at(np.array([300.0, 310.0]))
    with pytest.raises(ValueError, match="read-only"):
        state.viscosity[0] = 1.0
    assert state.viscosity is state.viscosity


def test_missing_raises_at_access_only(ink):
    state = ink.at(300.0)
    assert state.density > 0
    with pytest.raises(MissingProperty):
        _ = state.vapour_pressure


def test_out_of_range_raises_at_access(ink):
    state = ink.at(600.0)
    with pytest.raises(OutOfRange):
        _ = state.density
    assert np.isnan(ink.at(600.0, outside="nan").density)


def test_table_has_everything_that_defends_a_value(ink):
    table = ink.at("32 degC").table()
    assert isinstance(table, pd.DataFrame)
    row = table.loc["viscosity"]
    assert row["unit"] == "mPa*s"
    assert row["value"] == pytest.approx(ink.viscosity("32 degC").magnitude)
    assert row["uncertainty_95"] == pytest.approx(2 * row["uncertainty"] * row["value"])
    assert row["grade"] in dk.provenance.GRADES
    assert row["sources"]
    assert "K" in row["range"]
    assert ink.at(305.15).table().loc["viscosity", "unit"] == "Pa*s"


def test_a_property_out_of_its_range_stands_in_the_table_with_the_reason():
    heptane = dk.liquid("n-heptane")
    lows = [heptane.range(prop).low for prop in heptane.available()]
    table = heptane.at(min(lows)).table()
    lost = table[table["value"].isna()]
    assert len(lost) >= 1
    assert all("out of range" in text for text in lost["method"])


@pytest.mark.parametrize("temperature", ["32 degC", 305.15, np.array([300.0, 305.15])])
def test_json_rebuilds_the_state(ink, temperature):
    state = ink.at(temperature)
    back = State.from_dict(json.loads(json.dumps(state.to_dict())))
    assert back.available() == tuple(state.to_dict()["values"])
    for prop in back.available():
        assert np.array_equal(back.si()._property(prop), state.si()._property(prop))
        assert back.trail(prop) == state.trail(prop)
    assert back.cautions == state.cautions
    assert back.sources == state.sources
    assert repr(back) == repr(state)
    with pytest.raises(MissingProperty):
        _ = back.speed_of_sound


def test_not_a_state():
    with pytest.raises(BadInput, match="to_dict"):
        State.from_dict({"kind": "other"})


def test_pickle(ink):
    state = ink.at("32 degC")
    back = pickle.loads(pickle.dumps(state))
    assert back.viscosity.magnitude == state.viscosity.magnitude
    assert repr(back) == repr(state)


def test_display(ink):
    state = ink.at("32 degC")
    assert "mPa*s" in repr(state)
    assert "<table>" in state._repr_html_()
    assert "32 degC" in repr(state)


def test_cautions_and_citations(ink):
    state = ink.at("32 degC")
    assert any("low shear" in text for text in state.cautions)
    lines = dk.cite(state).splitlines()
    assert len(lines) == len(state.sources) > 0


def test_numbers_of_a_state(ink):
    sheet = ink.at("32 degC").numbers("60 um", "12 m/s")
    si = ink.at(305.15)
    expected = dk.numbers.ohnesorge(si.density, si.viscosity, si.surface_tension, 60e-6)
    table = sheet.table()
    assert expected == pytest.approx(float(table.loc["ohnesorge", "value"]), rel=1e-12)
