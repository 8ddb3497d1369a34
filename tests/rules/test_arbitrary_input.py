"""Whatever is thrown at the public callables, they answer or raise an error of dropkit's own.

The numbers and models have a matrix of their own (test_every_callable.py); here are the
callables that take names, compositions, frames and whole fluids.
"""

from __future__ import annotations

import contextlib
import math
import warnings
from typing import Any

import numpy as np
import pandas as pd
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import DropkitError
from dropkit.properties.state import State

scalars = st.one_of(
    st.floats(),
    st.integers(-(10**6), 10**6),
    st.booleans(),
    st.none(),
    st.complex_numbers(max_magnitude=1e3),
    st.text(max_size=8),
    st.sampled_from(
        [
            "rest",
            "20 degC",
            "38 %",
            "62 g",
            "250 mL",
            "2 mol",
            "4 mPa*s",
            "31 mN/m",
            "1,5 g",
            "mass",
        ]
    ),
)
anything = st.one_of(
    scalars,
    st.lists(scalars, max_size=4),
    st.tuples(scalars, st.sampled_from(["degC", "g", "%", "mPa*s", "nonsense"])),
    st.lists(st.floats(0, 1), max_size=4).map(np.array),
    st.dictionaries(st.text(max_size=4), scalars, max_size=2),
)
names = st.one_of(
    st.sampled_from(["water", "glycerol", "IPA", "NaCl", "toluene", "xylene", "mercury", "", "x"]),
    st.text(max_size=6),
)
# Mostly sensible, so that deeper code is reached too.
temperatures = st.one_of(st.floats(280.0, 320.0), st.just("25 degC"), anything)
fractions = st.one_of(st.floats(0.0, 1.0), st.just("rest"), anything)


def sound(value: Any, *, nan: bool = False) -> None:
    """No infinity, and NaN only where it may be."""
    array = np.asarray(getattr(value, "magnitude", value), dtype=float)
    assert not np.isinf(array).any()
    if not nan:
        assert not np.isnan(array).any()


def has_nan(value: Any) -> bool:
    try:
        return bool(np.isnan(np.asarray(value, dtype=float)).any())
    except (TypeError, ValueError):
        return "nan" in str(value).casefold()


@pytest.fixture(autouse=True)
def _quiet():
    with warnings.catch_warnings():
        warnings.simplefilter("error")
        warnings.simplefilter("ignore", dk.errors.DropkitWarning)
        yield


@given(names)
def test_liquid(name):
    try:
        found = dk.liquid(name)
    except DropkitError:
        return
    assert found.name in repr(found)


@settings(max_examples=300)
@given(
    st.dictionaries(names, fractions, max_size=4),
    st.one_of(st.sampled_from(["mass", "mole", "volume"]), st.none(), scalars),
    temperatures,
    st.sampled_from(["density", "viscosity", "kinematic_viscosity", "surface_tension"]),
)
def test_mixture(components, by, temperature, prop):
    try:
        mix = dk.mixture(components, by=by)
        value = getattr(mix, prop)(temperature)
        sound(value, nan=has_nan(temperature))
        repr(mix)
    except DropkitError:
        pass


@settings(max_examples=200)
@given(
    anything,
    st.dictionaries(
        st.sampled_from(
            ["density", "viscosity", "surface_tension", "kinematic_viscosity", "colour"]
        ),
        st.one_of(st.floats(1e-5, 1e4), anything, st.lists(st.tuples(temperatures, scalars))),
        max_size=3,
    ),
    st.one_of(st.none(), temperatures),
    st.booleans(),
    temperatures,
)
def test_fluid(name, values, at, plausible, temperature):
    try:
        mine = dk.fluid(name, at=at, plausible=plausible, **values)
        for prop in mine.available():
            sound(getattr(mine, prop)(temperature, outside="nan"), nan=True)
        repr(mine)
    except DropkitError:
        pass


@settings(max_examples=100)
@given(temperatures, anything, st.sampled_from(["raise", "warn", "nan", "allow"]))
def test_at_and_with_values(temperature, value, outside):
    ink = dk.mixture({"glycerol": 0.3, "water": "rest"}, by="mass")
    try:
        state = ink.with_values(surface_tension=value).at(temperature, outside=outside)
        state.table()
        again = State.from_dict(state.to_dict())
        assert again.name == state.name
    except DropkitError:
        pass


@settings(max_examples=100)
@given(
    anything,
    temperatures,
    st.one_of(st.sampled_from(["glycerol", "water", "temperature", "acetone"]), scalars),
    st.one_of(st.none(), anything),
    st.one_of(st.sampled_from(["mass", "mole", "volume"]), scalars),
)
def test_find(target, at, vary, between, by):
    ink = dk.mixture({"glycerol": 0.3, "water": "rest"}, by="mass")
    for options in (
        {"viscosity": target, "at": at, "vary": vary, "between": between, "by": by},
        {"density": 1050.0, "at": at, "vary": vary},
    ):
        try:
            found = ink.find(**options)
        except DropkitError:
            continue
        assert all(math.isfinite(value) for value in found.values)


@settings(max_examples=150)
@given(
    st.dictionaries(
        st.sampled_from(
            ["temperature", "T [degC]", "glycerol", "water", "glycerol [wt%]", "IPA [mol%]",
             "water [g]", "NaCl", "liquid", "glicerol", "note", "ethanol [furlong]"]
        ),
        st.lists(st.one_of(st.floats(0, 1), st.floats(280, 320), scalars), min_size=2, max_size=2),
        max_size=4,
    ),
    st.one_of(st.sampled_from(["mass", "mole"]), st.none(), scalars),
    st.one_of(st.just("water"), st.none(), scalars),
    st.sampled_from(["nan", "raise", "warn", "allow"]),
)  # fmt: skip
def test_lookup(columns, by, rest, outside):
    try:
        result = dk.lookup(pd.DataFrame(columns), by=by, rest=rest, outside=outside)
    except DropkitError:
        return
    values = result.filter(regex=r"^(density|viscosity|surface_tension) \[").to_numpy(dtype=float)
    assert not np.isinf(values).any()
    lost = np.isnan(values).any(axis=1)
    assert all(reason for reason in result["reason"][lost])


@settings(max_examples=100)
@given(
    st.dictionaries(names, st.one_of(fractions, st.lists(st.floats(0, 1), max_size=3)), max_size=3),
    st.one_of(temperatures, st.lists(st.floats(280, 320), max_size=3)),
    st.one_of(st.sampled_from(["mass", "volume"]), st.none(), scalars),
)
def test_grid(components, temperature, by):
    try:
        table = dk.grid(components, temperature, ["viscosity"], by=by)
    except DropkitError:
        return
    assert not np.isinf(table.filter(like="viscosity").to_numpy(dtype=float)).any()


@settings(max_examples=60)
@given(st.lists(st.one_of(names, anything), max_size=3), temperatures)
def test_compare(fluids, at):
    try:
        table = dk.compare(*fluids, at=at)
    except DropkitError:
        return
    assert len(table) > 0


@settings(max_examples=150)
@given(temperatures, st.one_of(st.floats(5e4, 2e5), anything), st.one_of(st.floats(0, 1), anything))
def test_air(temperature, pressure, humidity):
    try:
        gas = dk.air(temperature, pressure, humidity, outside="nan")
        sound(gas.density, nan=True)
        repr(gas)
    except DropkitError:
        pass


@given(st.lists(anything, max_size=2))
def test_cite(results):
    with contextlib.suppress(DropkitError):
        assert isinstance(dk.cite(*results), str)


@given(st.one_of(anything, st.dictionaries(st.sampled_from(["kind", "values"]), scalars)))
def test_state_from_dict(data):
    with pytest.raises(DropkitError):
        State.from_dict(data)
