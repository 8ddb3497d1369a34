"""One matrix for every public function of numbers and models: a new file is covered at once.

Each goes through scalars, 0-d and n-d arrays, NaN, units, Series, strings and everything that is
no number. What must come out: a value, NaN where the input was NaN, or an error of dropkit.
"""

from __future__ import annotations

import importlib
import inspect
import math
import pickle
import pkgutil
import warnings
from collections.abc import Iterator
from functools import cache
from typing import Any

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from hypothesis.extra import numpy as hnp

import dropkit.models
import dropkit.numbers
from dropkit.boundary import Boundary
from dropkit.errors import BadInput, DropkitError, DropkitWarning, UnitError, Unphysical
from dropkit.unit_table import KINDS


def boundaries() -> dict[str, Boundary[..., Any]]:
    """Every boundary of numbers and models, by module and name, found by walking the packages."""
    found: dict[str, Boundary[..., Any]] = {}
    for package in (dropkit.numbers, dropkit.models):
        for module_info in pkgutil.walk_packages(package.__path__, package.__name__ + "."):
            module = importlib.import_module(module_info.name)
            for name, value in vars(module).items():
                if isinstance(value, Boundary) and value.__module__ == module.__name__:
                    found[f"{module.__name__.removeprefix('dropkit.')}.{name}"] = value
    return found


FUNCTIONS = boundaries()
every_function = pytest.mark.parametrize("function", FUNCTIONS.values(), ids=FUNCTIONS)

# SI values at which every function gives a finite result: a fine jet of a watery ink that flies
# through air, by the word of the argument and, for words not here, by its kind. A new function
# that these do not suit adds its word here.
BY_WORD = {
    "holes": 3.0,
    "contraction": 0.9,
    "entry_loss": 1.0,
    "discharge_coefficient": 0.7,
    "flow_index": 1.0,
    "gas_density": 1.2,
    "wavelength": 5e-4,
    "drop_diameter": 2e-4,
    "radius_amplitude": 1e-6,
    "amplitude": 1e-6,
    "mean_free_path": 6.6e-8,
    "evaporation_constant": 5e-10,
    "far_mass_fraction": 0.01,
    "surface_tension_slope": -1.5e-4,
    "surface_tension_difference": 1e-3,
    "temperature_difference": 10.0,
    "absolute_pressure": 2e5,
    "vapour_heat_capacity": 1900.0,
    "obstacle": 1e-3,
    "constant": 12.0,
    "nozzle_length": 1e-3,
    "pipe_diameter": 1e-3,
    "edge_radius": 2e-6,
    "diameter_tolerance": 1e-6,
    "remaining": 0.01,
    "ambient_pressure": 1e5,
    "tip_diameter": 3e-3,
    "outer_diameter": 3e-3,
    "outer_density": 800.0,
    "outer_viscosity": 1e-3,
    "tip_ratio": 0.5,
    "formation_time": 60.0,
    "velocity_amplitude": 0.05,
    "pressure_amplitude": 1e3,
    "kinetic_factor": 1.5,
    "count": 2.0,
    "reduced_wavenumber": 0.6,
    "ohnesorge_radius": 0.1,
    "share": 0.8,
    "solvent_viscosity": 1e-3,
}
BY_KIND = {
    "temperature": 298.15,
    "density": 1000.0,
    "viscosity": 5e-3,
    "gas_viscosity": 1.8e-5,
    "surface_tension": 0.05,
    "vapour_pressure": 2300.0,
    "heat_of_vaporisation": 2.4e6,
    "heat_capacity": 4000.0,
    "thermal_conductivity": 0.5,
    "diffusivity": 1e-9,
    "velocity": 8.0,
    "length": 1e-4,
    "radius": 5e-5,
    "distance": 0.01,
    "frequency": 2e4,
    "time": 1e-3,
    "flow": 6e-8,
    "growth_rate": 5e3,
    "acceleration": 9.80665,
    "pressure": 1e5,
    "gauge_pressure": 5e5,
    "stress": 10.0,
    "shear_rate": 1e4,
    "charge": 1e-13,
    "electric_field": 1e6,
    "voltage": 100.0,
    "mass_fraction": 0.2,
    "mass_transfer_coefficient": 0.1,
    "heat_transfer_coefficient": 100.0,
    "volume": 4e-8,
    "mass": 4e-5,
}
# Functions whose range lies apart from that jet.
BY_FUNCTION: dict[str, dict[str, float]] = {
    "jet_diameter_turbulent_pipe": {"nozzle_diameter": 5e-3},
    "jet_diameter_sharp_orifice": {"nozzle_diameter": 5e-3},
    "entrance_length_turbulent": {"nozzle_diameter": 5e-3},
    "pressure_turbulent_tube": {"nozzle_diameter": 5e-3, "nozzle_length": 0.1, "flow": 2e-4},
    "flow_turbulent_tube": {"nozzle_diameter": 5e-3, "nozzle_length": 0.1},
    "discharge_coefficient_thin_plate": {"nozzle_length": 3e-5},
    "pressure_thin_plate": {"nozzle_length": 3e-5},
    "flow_thin_plate": {"nozzle_length": 3e-5},
    "jetting_velocity_liquid": {"drop_diameter": 5e-3},
    "turbulent_pipe_breakup_length": {"jet_diameter": 5e-3},
    # One of three is needed, so that one stands here although None is its default.
    "stimulated_breakup_length": {"radius_amplitude": 1e-6},
}


def sample(function: Boundary[..., Any]) -> dict[str, float]:
    """Values for all physical arguments that need one."""
    parameters = inspect.signature(function).parameters
    own = BY_FUNCTION.get(function.__name__, {})
    return {
        word: own.get(word, BY_WORD.get(word, BY_KIND.get(kind, 1.0)))
        for word, kind in function.kinds.items()
        if parameters[word].default is not None or word in own
    }


def words_of(function: Boundary[..., Any]) -> list[str]:
    """The physical arguments that need a value, in order."""
    return list(sample(function))


def parts(result: Any) -> list[Any]:
    """The values in a result: itself, or those of a tuple or dict."""
    if isinstance(result, dict):
        return list(result.values())
    return list(result) if isinstance(result, tuple) else [result]


def quietly(function: Boundary[..., Any], *args: Any, **kwargs: Any) -> Any:
    """Call with warnings of dropkit let through: NaN with a warning is an answer."""
    with warnings.catch_warnings():
        warnings.simplefilter("ignore", DropkitWarning)
        return function(*args, **kwargs)


def kinds_of_result(function: Boundary[..., Any]) -> list[str]:
    """Kinds of the values in a result."""
    returns = function.returns
    if isinstance(returns, dict):
        return list(returns.values())
    return list(returns) if isinstance(returns, tuple) else [returns]


# --- numbers in every form ---------------------------------------------------------------


@every_function
def test_floats_give_finite_floats(function: Boundary[..., Any]) -> None:
    for value in parts(function(**sample(function))):
        assert type(value) is float
        assert math.isfinite(value)


@every_function
def test_by_position_as_by_name(function: Boundary[..., Any]) -> None:
    parameters = inspect.signature(function).parameters
    args = [
        value
        for word, value in sample(function).items()
        if parameters[word].kind is not parameters[word].KEYWORD_ONLY
    ]
    rest = {
        word: v for word, v in sample(function).items() if word not in list(parameters)[: len(args)]
    }
    assert parts(function(*args, **rest)) == parts(function(**sample(function)))


@every_function
def test_the_core_gives_the_same(function: Boundary[..., Any]) -> None:
    assert parts(function.si(**sample(function))) == parts(function(**sample(function)))


@every_function
@pytest.mark.parametrize("make", [np.float64, np.float32, np.array], ids=["f64", "f32", "0-d"])
def test_numpy_scalars_and_0d_give_floats(function: Boundary[..., Any], make: Any) -> None:
    expected = parts(function(**sample(function)))
    found = parts(function(**{word: make(v) for word, v in sample(function).items()}))
    assert [type(value) for value in found] == [float] * len(found)
    assert found == pytest.approx(expected, rel=1e-4)  # float32 carries seven figures


@every_function
def test_integers_are_numbers(function: Boundary[..., Any]) -> None:
    first = words_of(function)[0]
    base = sample(function)
    if function.domains[first] != "0..1" and base[first] >= 1:
        whole = {**base, first: round(base[first])}
        assert parts(function(**whole)) == parts(function(**{**base, first: float(whole[first])}))
    else:
        assert all(type(v) is float for v in parts(function(**base)))


@every_function
def test_arrays_broadcast_and_agree_with_scalars(function: Boundary[..., Any]) -> None:
    base = sample(function)
    words = words_of(function)
    factors = np.array([0.999, 1.0, 1.001])
    given_ = dict(base)
    given_[words[0]] = base[words[0]] * factors[:, None]
    shape: tuple[int, ...] = (3, 1)
    if len(words) > 1:
        given_[words[1]] = base[words[1]] * factors[None, :2]
        shape = (3, 2)
    found = parts(function(**given_))
    for index in np.ndindex(shape):
        one = {
            word: float(v[tuple(i if n > 1 else 0 for i, n in zip(index, v.shape, strict=True))])
            if isinstance(v, np.ndarray)
            else v
            for word, v in given_.items()
        }
        for array, value in zip(found, parts(function(**one)), strict=True):
            assert array.shape == shape
            assert array.dtype == np.float64
            assert array[index] == pytest.approx(value, rel=1e-12, abs=0.0)


@every_function
def test_the_input_is_left_alone_and_no_result_shares_its_memory(
    function: Boundary[..., Any],
) -> None:
    arrays = {word: np.full(3, v) for word, v in sample(function).items()}
    before = {word: array.copy() for word, array in arrays.items()}
    for value in parts(function(**arrays)):
        assert not any(np.shares_memory(value, array) for array in arrays.values())
    for word, array in arrays.items():
        np.testing.assert_array_equal(array, before[word])


@every_function
def test_empty_arrays_give_empty_arrays(function: Boundary[..., Any]) -> None:
    first = words_of(function)[0]
    for value in parts(function(**{**sample(function), first: np.empty(0)})):
        assert value.shape == (0,)


@every_function
def test_shapes_that_do_not_fit_raise(function: Boundary[..., Any]) -> None:
    base = sample(function)
    words = words_of(function)
    if len(words) == 1:
        assert parts(function(**{words[0]: np.full(2, base[words[0]])}))[0].shape == (2,)
        return
    clash = {words[0]: np.full(2, base[words[0]]), words[1]: np.full(3, base[words[1]])}
    with pytest.raises(BadInput, match="broadcast"):
        function(**{**base, **clash})


# --- NaN -----------------------------------------------------------------------------------


@every_function
def test_nan_gives_nan_in_silence(function: Boundary[..., Any]) -> None:
    base = sample(function)
    for word in base:
        with warnings.catch_warnings():
            warnings.simplefilter("error")
            result = parts(function(**{**base, word: math.nan}))
        assert any(math.isnan(value) for value in result), word
        assert all(type(value) is float for value in result)


@every_function
def test_a_nan_element_touches_only_itself(function: Boundary[..., Any]) -> None:
    base = sample(function)
    clean = parts(function(**base))
    for word, value in base.items():
        column = np.array([value, np.nan, value])
        with warnings.catch_warnings():
            warnings.simplefilter("error")
            found = parts(function(**{**base, word: column}))
        for array, scalar in zip(found, clean, strict=True):
            assert array[[0, 2]] == pytest.approx([scalar, scalar], rel=1e-12)
        assert any(np.isnan(array[1]) for array in found), word


# --- units -----------------------------------------------------------------------------------


def in_stock(kind: str, value: float) -> tuple[float, str]:
    """A value and its trade unit."""
    entry = KINDS[kind]
    return (value - entry.zero) / entry.per_stock, entry.stock


def check_carried(function: Boundary[..., Any], found: Any) -> None:
    """Results that carry a unit, equal to those of SI input."""
    expected = parts(function(**sample(function)))
    for value, kind, si in zip(parts(found), kinds_of_result(function), expected, strict=True):
        if KINDS[kind].plain:
            assert type(value) is float
        else:
            value = value.to(KINDS[kind].si).magnitude
        assert value == pytest.approx(si, rel=1e-9)


@every_function
def test_strings_with_units(function: Boundary[..., Any]) -> None:
    texts = {}
    for word, value in sample(function).items():
        number, unit = in_stock(function.kinds[word], value)
        texts[word] = f"{number!r} {unit}".strip()
    if any(KINDS[kind].si for kind in function.kinds.values()):
        check_carried(function, function(**texts))
    else:
        assert parts(function(**texts)) == pytest.approx(parts(function(**sample(function))))


@every_function
def test_pairs_of_value_and_unit(function: Boundary[..., Any]) -> None:
    for word, value in sample(function).items():
        number, unit = in_stock(function.kinds[word], value)
        if unit:
            check_carried(function, function(**{**sample(function), word: (number, unit)}))
            return
    assert not any(KINDS[kind].si for kind in function.kinds.values())


@cache
def registry_of_a_user() -> Any:
    """A registry that is not pint's application registry."""
    import pint

    return pint.UnitRegistry()


@every_function
def test_quantities(function: Boundary[..., Any]) -> None:
    registry = registry_of_a_user()
    carried = False
    base: dict[str, Any] = sample(function)
    for word, value in base.items():
        entry = KINDS[function.kinds[word]]
        if entry.si:
            base[word] = registry.Quantity(value, entry.si)
            carried = True
    found = function(**base)
    if carried:
        check_carried(function, found)
        for value, kind in zip(parts(found), kinds_of_result(function), strict=True):
            if not KINDS[kind].plain:
                assert value._REGISTRY is registry
    else:
        assert parts(found) == parts(function(**sample(function)))


@every_function
def test_series_keep_their_index(function: Boundary[..., Any]) -> None:
    import pandas as pd

    base = sample(function)
    word = words_of(function)[0]
    column = pd.Series([base[word]] * 3, index=["a", "b", "c"])
    expected = parts(function(**base))
    for value, scalar in zip(parts(function(**{**base, word: column})), expected, strict=True):
        assert isinstance(value, pd.Series)
        assert list(value.index) == ["a", "b", "c"]
        assert value.to_numpy() == pytest.approx([scalar] * 3, rel=1e-12)


@every_function
def test_wrong_units_raise(function: Boundary[..., Any]) -> None:
    base = sample(function)
    for word, kind in function.kinds.items():
        if word in base:
            wrong = "3 kg" if KINDS[kind].dimension != KINDS["mass"].dimension else "3 m"
            with pytest.raises(UnitError, match=word):
                function(**{**base, word: wrong})


# --- what is no number ---------------------------------------------------------------------

NO_NUMBERS: list[Any] = [
    True,
    np.True_,
    1 + 2j,
    np.complex128(1),
    "many",
    "",
    "1,5 m",
    b"1",
    {},
    {1, 2},
    object(),
    [1.0, "two"],
    np.array(["1.0", "2.0"]),
    np.array([True, False]),
    np.array([1 + 1j]),
    np.array([1.0, "x"], dtype=object),
    (1.0, "no_such_unit"),
    lambda: 1.0,
]


@every_function
def test_what_is_no_number_raises(function: Boundary[..., Any]) -> None:
    base = sample(function)
    for word in base:
        for bad in [*NO_NUMBERS, None]:
            with pytest.raises(BadInput):
                function(**{**base, word: bad})


@every_function
def test_infinity_and_values_outside_the_domain_raise(function: Boundary[..., Any]) -> None:
    base = sample(function)
    for word in base:
        bad = [math.inf, -math.inf]
        bad += {"> 0": [0.0, -1.0], ">= 0": [-1.0], "0..1": [-0.01, 1.01], "any": []}[
            function.domains[word]
        ]
        for value in bad:
            with pytest.raises(Unphysical, match=word):
                function(**{**base, word: value})
            with pytest.raises(Unphysical, match=word):
                function(**{**base, word: np.array([base[word], value])})


@every_function
def test_missing_and_unknown_arguments_are_type_errors(function: Boundary[..., Any]) -> None:
    needed = [
        word
        for word, parameter in inspect.signature(function).parameters.items()
        if parameter.default is parameter.empty
    ]
    base = sample(function)
    with pytest.raises(TypeError, match=needed[0]):
        function(**{word: v for word, v in base.items() if word != needed[0]})
    with pytest.raises(TypeError, match="no_such_argument"):
        function(**base, no_such_argument=1.0)


@every_function
def test_pickles_by_reference_and_keeps_its_help(function: Boundary[..., Any]) -> None:
    assert pickle.loads(pickle.dumps(function)) is function
    assert function.__doc__
    assert list(inspect.signature(function).parameters)[: len(function.kinds)]
    assert set(function.kinds) == set(function.domains)


# --- arbitrary input -------------------------------------------------------------------------

any_float = st.one_of(
    st.floats(),
    st.floats(1e-9, 1e9),
    st.sampled_from([0.0, -0.0, 5e-324, 1e-308, 1e-200, 1e200, 1.7e308, math.inf, math.nan]),
)
any_thing = st.one_of(
    any_float,
    st.integers(),
    st.text(max_size=12),
    st.booleans(),
    st.none(),
    st.complex_numbers(),
    st.tuples(any_float, st.text(max_size=5)),
    st.lists(any_float, max_size=3),
    hnp.arrays(
        st.one_of(hnp.floating_dtypes(), hnp.integer_dtypes(), hnp.complex_number_dtypes()),
        hnp.array_shapes(max_dims=2, max_side=3),
    ),
)
several = settings(max_examples=15)


def told(caught: list[warnings.WarningMessage]) -> bool:
    """Whether dropkit said that something became NaN; anything else that warns is a fault."""
    others = [str(item.message) for item in caught if not issubclass(item.category, DropkitWarning)]
    assert others == []
    return bool(caught)


@every_function
@several
@given(data=st.data())
def test_arbitrary_floats_give_a_value_or_an_error_of_dropkit(
    function: Boundary[..., Any], data: st.DataObject
) -> None:
    values = {word: data.draw(any_float, label=word) for word in words_of(function)}
    with warnings.catch_warnings(record=True) as caught:
        warnings.simplefilter("always")
        try:
            result = function(**values)
        except DropkitError:
            return
    said = told(caught)
    for value in parts(result):
        assert type(value) is float
        assert not math.isinf(value)
        if math.isnan(value):
            assert said or any(math.isnan(v) for v in values.values()), "silent NaN"


@every_function
@several
@given(data=st.data())
def test_arbitrary_float_arrays_likewise(function: Boundary[..., Any], data: st.DataObject) -> None:
    values = {
        word: np.array(data.draw(st.lists(any_float, min_size=3, max_size=3), label=word))
        for word in words_of(function)
    }
    with warnings.catch_warnings(record=True) as caught:
        warnings.simplefilter("always")
        try:
            result = function(**values)
        except DropkitError:
            return
    said = told(caught)
    unknown = np.any([np.isnan(v) for v in values.values()], axis=0)
    for array in parts(result):
        assert array.shape == (3,)
        assert not np.isinf(array).any()
        assert said or not (np.isnan(array) & ~unknown).any(), "silent NaN"


@every_function
@several
@given(data=st.data())
def test_arbitrary_things_raise_only_errors_of_dropkit(
    function: Boundary[..., Any], data: st.DataObject
) -> None:
    base: dict[str, Any] = sample(function)
    word = data.draw(st.sampled_from(words_of(function)), label="word")
    base[word] = data.draw(any_thing, label="value")
    try:
        result = quietly(function, **base)
    except DropkitError:
        return
    for value in parts(result):
        magnitude = np.asarray(getattr(value, "magnitude", value), dtype=float)
        assert not np.isinf(magnitude).any()


def kinds_without_a_sample() -> Iterator[str]:
    """Words whose sample is the last resort, 1."""
    for name, function in FUNCTIONS.items():
        for word, kind in function.kinds.items():
            own = BY_FUNCTION.get(function.__name__, {})
            if word not in own and word not in BY_WORD and kind not in BY_KIND:
                yield f"{name}: {word} ({kind})"


def test_every_argument_has_a_sample_of_its_size() -> None:
    assert list(kinds_without_a_sample()) == []


def test_the_matrix_is_not_empty() -> None:
    assert len(FUNCTIONS) >= 68
    assert "numbers.capillarity.weber" in FUNCTIONS
    assert any(name.startswith("models.") for name in FUNCTIONS)
