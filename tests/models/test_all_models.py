"""What holds for every published model alike: units, shapes, NaN, bad input, pickling."""

from __future__ import annotations

import math
import pickle
import warnings
from typing import Any

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.boundary import Boundary
from dropkit.errors import BadInput, DropkitError, DropkitWarning, UnitError, Unphysical
from dropkit.models.catalogue import ModelEntry, model_entries
from dropkit.models.families import family_names
from dropkit.unit_table import KINDS

ENTRIES = model_entries()
every_model = pytest.mark.parametrize("entry", ENTRIES, ids=[entry.name for entry in ENTRIES])

# A jet of a water-like liquid inside the range of every model; others are scaled from it.
CASE = {
    "density": 1000.0,
    "viscosity": 4e-3,
    "surface_tension": 0.05,
    "velocity": 8.0,
    "jet_diameter": 100e-6,
    "nozzle_diameter": 100e-6,
    "wavelength": 480e-6,
    "drop_diameter": 190e-6,
    "flow": 6.3e-8,
    "frequency": 2e4,
    "growth_rate": 5e3,
    "radius_amplitude": 1e-7,
    "constant": 10.0,
}


def function_of(entry: ModelEntry) -> Boundary[..., Any]:
    """The function behind an entry."""
    found = getattr(family_names(f"dropkit.models.{entry.family}")[entry.name], entry.name)
    assert isinstance(found, Boundary)
    return found


def case_of(entry: ModelEntry) -> dict[str, Any]:
    """Arguments inside the ranges of a model."""
    function = function_of(entry)
    case = {word: CASE[word] for word in function.kinds}
    if entry.name == "jet_diameter_laminar_pipe":
        case["viscosity"] = 1e-3
    if entry.name == "jet_diameter_turbulent_pipe":
        case["nozzle_diameter"] = 2e-3
        case["viscosity"] = 1e-3
    return case


def parts(result: Any) -> tuple[Any, ...]:
    """The results, one or several."""
    return tuple(result) if isinstance(result, tuple) else (result,)


def scale(kind: str, factors: list[float]) -> float:
    """By what a value of a kind grows when each base unit shrinks by its factor."""
    return math.prod(
        factor**exponent for factor, exponent in zip(factors, KINDS[kind].dimension, strict=True)
    )


@every_model
@given(powers=st.lists(st.floats(-3, 3), min_size=3, max_size=3))
def test_units_of_measurement_do_not_matter(entry: ModelEntry, powers: list[float]) -> None:
    function, case = function_of(entry), case_of(entry)
    factors = [10.0**power for power in powers] + [1.0, 1.0, 1.0]
    scaled = {word: value * scale(function.kinds[word], factors) for word, value in case.items()}
    kinds = parts(function.returns)
    for before, after, kind in zip(
        parts(function.si(**case)), parts(function.si(**scaled)), kinds, strict=True
    ):
        assert after == pytest.approx(before * scale(kind, factors), rel=1e-9, abs=0.0)


@every_model
def test_shapes_and_nan(entry: ModelEntry) -> None:
    function, case = function_of(entry), case_of(entry)
    plain = parts(function(**case))
    assert all(type(value) is float and value > 0.0 for value in plain)
    for word in case:
        grid = {**case, word: np.array([[case[word]], [np.nan]])}
        other = next((name for name in case if name != word), None)
        if other:
            grid[other] = np.full(3, case[other])
        for value, single in zip(parts(function(**grid)), plain, strict=True):
            assert value.shape == ((2, 3) if other else (2, 1))
            np.testing.assert_allclose(value[0], single, rtol=1e-14)
            assert np.isnan(value[1]).all()
        zero_d = parts(function(**{**case, word: np.array(case[word])}))
        assert zero_d == plain


@every_model
def test_units_in_units_out(entry: ModelEntry) -> None:
    function, case = function_of(entry), case_of(entry)
    for word, kind in function.kinds.items():
        if KINDS[kind].plain:
            continue
        asked = {**case, word: (case[word], KINDS[kind].si)}
        for value, single, its in zip(
            parts(function(**asked)),
            parts(function(**case)),
            parts(function.returns),
            strict=True,
        ):
            assert value.to(KINDS[its].si).magnitude == pytest.approx(single, rel=1e-12)


@every_model
def test_bad_input(entry: ModelEntry) -> None:
    function, case = function_of(entry), case_of(entry)
    for word, kind in function.kinds.items():
        with pytest.raises(UnitError):
            function(**{**case, word: "3 V"})
        with pytest.raises(BadInput):
            function(**{**case, word: True})
        with pytest.raises(Unphysical):
            function(**{**case, word: -case[word]})
        with pytest.raises(Unphysical):
            function(**{**case, word: math.inf})
        assert kind in KINDS


@every_model
@given(data=st.data())
def test_only_own_exceptions(entry: ModelEntry, data: st.DataObject) -> None:
    function = function_of(entry)
    numbers = st.floats(allow_nan=True, allow_infinity=True)
    anything = st.one_of(numbers, st.text(max_size=6), st.lists(numbers, max_size=3), st.none())
    call = {word: data.draw(anything) for word in function.kinds}
    if "outside" in function.__wrapped__.__annotations__:
        call["outside"] = data.draw(st.sampled_from(["raise", "nan"]))
    with warnings.catch_warnings(record=True) as caught:
        warnings.simplefilter("always")
        try:
            result = parts(function(**call))
        except DropkitError:
            return
    assert all(issubclass(warning.category, DropkitWarning) for warning in caught)
    found = np.array([getattr(value, "magnitude", value) for value in result], dtype=float)
    assert not np.isinf(found).any()
    # NaN comes from NaN, or was asked for, or is spoken of.
    given_nan = any(
        np.isnan(np.asarray(value, dtype=float)).any()
        for value in call.values()
        if isinstance(value, (float, list))
    )
    assert not np.isnan(found).any() or given_nan or caught or call.get("outside") == "nan"


@every_model
def test_pickles_by_reference(entry: ModelEntry) -> None:
    assert pickle.loads(pickle.dumps(function_of(entry))) is function_of(entry)
