"""Whole frames of compositions and temperatures, grids, and comparisons."""

from __future__ import annotations

import numpy as np
import pandas as pd
import pytest

import dropkit as dk
from dropkit.errors import (
    BadInput,
    BasisMissing,
    CompositionError,
    OutOfRange,
    UnitError,
    UnknownName,
)


def test_lookup_with_units_in_the_headers():
    frame = pd.DataFrame(
        {"batch": ["a", "b"], "glycerol [wt%]": [20.0, 40.0], "T [degC]": [20.0, 30.0]},
        index=["first", "second"],
    )
    result = dk.lookup(frame, rest="water")
    assert list(result.index) == ["first", "second"]
    assert list(result["batch"]) == ["a", "b"]
    for row, (share, kelvin) in zip(result.itertuples(), [(0.2, 293.15), (0.4, 303.15)],
                                    strict=True):  # fmt: skip
        ink = dk.mixture({"glycerol": share, "water": "rest"}, by="mass")
        assert result.loc[row.Index, "viscosity [mPa*s]"] == pytest.approx(
            1e3 * ink.viscosity(kelvin), rel=1e-12
        )
        assert row.grade == ink.grade()
        assert row.reason == ""


def test_lookup_in_si():
    frame = pd.DataFrame({"temperature": [293.15], "ethanol": [0.4], "water": [0.6]})
    result = dk.lookup(frame, ["density"], by="mass")
    assert result["density [kg/m3]"].iloc[0] == pytest.approx(935.2, rel=1e-3)  # OIML R 22


def test_rows_that_cannot_be_had_say_why():
    frame = pd.DataFrame(
        {
            "temperature [degC]": [20, 900, np.nan, 20, 20, -300],
            "glycerol": [0.2, 0.2, 0.2, np.nan, 1.4, 0.2],
        }
    )
    result = dk.lookup(frame, ["viscosity"], by="mass", rest="water")
    values = result["viscosity [mPa*s]"]
    assert list(values.isna()) == [False, True, True, True, True, True]
    reasons = list(result["reason"])
    assert reasons[0] == ""
    for text, says in zip(
        reasons[1:],
        ["outside", "temperature is missing", "glycerol is missing", "-0.4", "0 K"],
        strict=True,
    ):
        assert says in text
    with pytest.raises(OutOfRange):
        dk.lookup(frame.iloc[[1]], ["viscosity"], by="mass", rest="water", outside="raise")


def test_pure_liquids_by_name():
    frame = pd.DataFrame({"liquid": ["water", "IPA", "nonsense"], "temperature": [300.0] * 3})
    result = dk.lookup(frame, ["viscosity"])
    assert result["viscosity [Pa*s]"].iloc[1] == dk.liquid("IPA").viscosity(300.0)
    assert "nonsense" in result["reason"].iloc[2]


def test_zeros_do_not_spoil_a_row():
    frame = pd.DataFrame(
        {"temperature": [300.0, 300.0], "glycerol": [0.2, 0.2], "ethanol": [0.0, 0.1]}
    )
    result = dk.lookup(frame, by="mass", rest="water")
    assert list(result["grade"] == "estimated") == [False, True]


@pytest.mark.parametrize(
    ("columns", "options", "error", "says"),
    [
        ({"glycerol": [0.2]}, {"by": "mass", "rest": "water"}, BadInput, "temperature"),
        ({"temperature": [300.0]}, {}, BadInput, "liquid"),
        ({"temperature": [300.0], "glicerol": [0.2]}, {"by": "mass"}, UnknownName, "glycerol"),
        ({"temperature": [300.0], "foo [%]": [0.2]}, {"by": "mass"}, UnknownName, "foo"),
        ({"temperature": [300.0], "glycerol": [0.2]}, {"rest": "water"}, CompositionError, "by="),
        ({"temperature": ["a"], "glycerol": [0.2]}, {"by": "mass"}, BadInput, "text"),
        ({"temperature [mPa*s]": [1.0], "glycerol": [0.2]}, {"by": "mass"}, UnitError, "temp"),
        ({"temperature": [300.0], "glycerol [wt%]": [2.0], "water [vol%]": [98.0]}, {},
         CompositionError, "bases"),
    ],
)  # fmt: skip
def test_frames_that_fail(columns, options, error, says):
    with pytest.raises(error) as caught:
        dk.lookup(pd.DataFrame(columns), **options)
    assert says in str(caught.value)


def test_not_a_frame():
    with pytest.raises(BadInput, match="DataFrame"):
        dk.lookup({"temperature": [300.0]})


def test_grid_is_labelled():
    table = dk.grid(
        {"glycerol": [0.1, 0.3, 0.5], "water": "rest"}, ["20 degC", "40 degC"], by="mass"
    )
    assert table.index.names == ["glycerol", "temperature [degC]"]
    value = table.loc[(0.3, 40.0), "viscosity [mPa*s]"]
    ink = dk.mixture({"glycerol": 0.3, "water": "rest"}, by="mass")
    assert value == pytest.approx(1e3 * ink.viscosity(313.15), rel=1e-9)
    assert table["viscosity [mPa*s]"].unstack().shape == (3, 2)
    with pytest.raises(BasisMissing):
        dk.grid({"glycerol": [0.1], "water": "rest"}, [300.0])


def test_compare_side_by_side():
    mine = dk.fluid("mine", density=1000.0)
    table = dk.compare("water", "glycerol", mine, at="25 degC", properties=["density", "viscosity"])
    assert list(table.index) == ["density [kg/m3]", "viscosity [mPa*s]"]
    assert table["glycerol"]["value"].iloc[1] == pytest.approx(
        1e3 * dk.liquid("glycerol").viscosity(298.15)
    )
    assert table["mine"]["grade"].iloc[1] == "missing"
    assert dk.compare("water", at=298.15).index[1] == "viscosity [Pa*s]"
    with pytest.raises(BadInput):
        dk.compare(at=298.15)
    with pytest.raises(UnknownName, match="glycerol"):
        dk.compare("glicerol", at=298.15)
