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
    "gauge_pressure": 3e5,
    "pressure_drop": 2e5,
    "absolute_pressure": 3e5,
    "ambient_pressure": 1e5,
    "vapour_pressure": 2.3e3,
    "nozzle_length": 1e-3,
    "pipe_diameter": 3e-4,
    "edge_radius": 2e-6,
    "contraction": 0.8,
    "entry_loss": 0.3,
    "discharge_coefficient": 0.6,
    "flow_index": 0.6,
    "remaining": 0.01,
    "holes": 10.0,
    "diameter_tolerance": 1e-6,
    "height": 0.1,
    "gravity": 9.80665,
    "tip_diameter": 3e-3,
    "outer_diameter": 3e-3,
    "outer_density": 800.0,
    "outer_viscosity": 1e-3,
    "interfacial_tension": 0.05,
    "gas_density": 1.2,
    "volume": 4e-8,
    "mass": 4e-5,
    "tip_ratio": 0.5,
    "formation_time": 60.0,
    "velocity_amplitude": 0.05,
    "pressure_amplitude": 1e3,
    "kinetic_factor": 1.5,
    "temperature": 300.0,
    "breakup_length": 0.01,
    "distance": 0.1,
    "count": 2.0,
    "merged_diameter": 3e-4,
    "reduced_wavenumber": 0.6,
    "ohnesorge_radius": 0.1,
    "share": 0.8,
    "solvent_viscosity": 1e-3,
    "relaxation_time": 1e-3,
    "radius": 50e-6,
}


# Their constant of nature is an energy per kelvin.
WITH_BOLTZMANN = ("thermal_breakup_length",)


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
    rough = entry.family == "nozzle" and "turbulent" in entry.name
    if rough or entry.name in ("jet_diameter_turbulent_pipe", "jet_diameter_sharp_orifice"):
        wide = {"nozzle_diameter": 2e-3, "nozzle_length": 0.05, "flow": 3e-5, "viscosity": 1e-3}
        case |= {word: value for word, value in wide.items() if word in case}
    if entry.name.endswith("thin_plate"):
        case["nozzle_length"] = 3e-5
    if entry.name == "turbulent_pipe_breakup_length":
        case |= {"jet_diameter": 5e-3, "viscosity": 1e-3}
    if entry.name == "stimulated_breakup_length":  # exactly one amplitude
        nozzle = ("nozzle_diameter", "nozzle_length", "kinetic_factor")
        for word in ("velocity_amplitude", "pressure_amplitude", "growth_rate", *nozzle):
            del case[word]
    if entry.name == "satellite_volume_share" or entry.name == "satellite_diameter":
        case["radius_amplitude"] = 1e-6
    if entry.name == "jetting_velocity_liquid":
        case["drop_diameter"] = 5e-3
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
    if entry.name in WITH_BOLTZMANN:  # units in which an energy has the same number
        factors[2] = factors[0] * math.sqrt(factors[1])
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
    for word in case:
        kind = function.kinds[word]
        if KINDS[kind].plain:
            continue
        asked = {**case, word: (case[word], KINDS[kind].si)}
        for value, single, its in zip(
            parts(function(**asked)),
            parts(function(**case)),
            parts(function.returns),
            strict=True,
        ):
            found = value if KINDS[its].plain else value.to(KINDS[its].si).magnitude
            assert found == pytest.approx(single, rel=1e-12)


@every_model
def test_bad_input(entry: ModelEntry) -> None:
    function, case = function_of(entry), case_of(entry)
    for word in case:
        kind = function.kinds[word]
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
