"""The boundary around an SI core: input of any form, results as asked, and nothing lost."""

from __future__ import annotations

import copy
import inspect
import math
import pickle
import pydoc
import subprocess
import sys
import textwrap
import typing
import warnings
from collections.abc import Iterator
from pathlib import Path
from typing import Any, NamedTuple

import numpy as np
import pandas as pd
import pint
import pytest
from hypothesis import given
from hypothesis import strategies as st
from mypy import api as mypy

from dropkit.boundary import Boundary, physical
from dropkit.errors import BadInput, DropkitError, DropkitWarning, OutOfRange, UnitError, Unphysical

ROOT = Path(__file__).parents[1]
PRIVATE = pint.UnitRegistry()


@physical(returns="ratio")
def weber(density: float, surface_tension: float, velocity: float, length: float) -> float:
    """Inertia over surface tension, on the diameter.

    Examples
    --------
    >>> weber(1000.0, 0.05, 10.0, 1e-4)
    200.0
    """
    return density * velocity**2 * length / surface_tension


@physical(returns="time")
def capillary_time(density: float, surface_tension: float, length: float) -> float:
    """Time in which surface tension moves a body of that size."""
    return typing.cast(float, (density * length**3 / surface_tension) ** 0.5)


@physical(returns="distance", time="time >= 0")
def fall(time: float, *, gravity: float = 9.80665, units: str = "kept") -> float:
    """Distance of a free fall."""
    assert units == "kept"
    return 0.5 * gravity * time**2


@physical(returns=("length", "time"))
def both(length: float, velocity: float) -> tuple[float, float]:
    """A length, and the time to pass it."""
    return length, length / velocity


class Pair(NamedTuple):
    """Two results with names."""

    size: float
    wait: float


@physical(returns=("length", "time"))
def named(length: float, velocity: float) -> Pair:
    """A length, and the time to pass it, by name."""
    return Pair(length, length / velocity)


@physical(returns={"size": "length", "weber": "ratio"})
def keyed(length: float, velocity: float) -> dict[str, float]:
    """Results by key."""
    return {"size": 2 * length, "weber": velocity}


@physical(returns=None)
def regime(velocity: float) -> str:
    """No quantity at all."""
    return "fast" if velocity > 1 else "slow"


@physical(returns="length")
def optional(length: float, velocity: float | None = None) -> float:
    """An argument that may be absent."""
    return length if velocity is None else length * velocity


WATER = (998.2, 0.0727, 10.0, 60e-6)
SI = 998.2 * 10.0**2 * 60e-6 / 0.0727


@pytest.fixture
def application() -> Iterator[None]:
    """Puts pint's application registry back after a test has changed it."""
    before = pint.get_application_registry().get()
    yield
    pint.set_application_registry(before)


# --- floats ------------------------------------------------------------------------------------


def test_floats_give_the_cores_own_result() -> None:
    assert weber(*WATER) == weber.si(*WATER) == pytest.approx(SI, rel=1e-15)
    assert type(weber(*WATER)) is float
    assert weber(density=998.2, surface_tension=0.0727, velocity=10.0, length=60e-6) == SI
    assert weber(998.2, 0.0727, length=60e-6, velocity=10.0) == SI


@pytest.mark.parametrize("as_type", [int, np.float64, np.float32, np.int64, np.array])
def test_every_scalar_gives_a_float(as_type: Any) -> None:
    result = weber(as_type(1000), as_type(1), as_type(2), as_type(3))
    assert type(result) is float
    assert result == 12000.0


def test_nan_gives_nan_without_a_warning() -> None:
    assert math.isnan(weber(math.nan, 0.0727, 10.0, 60e-6))
    result = weber(np.array([1000.0, np.nan]), 0.1, 10.0, 1e-3)
    np.testing.assert_array_equal(result, [1000.0, np.nan])


def test_defaults_are_si_and_options_pass_untouched() -> None:
    assert fall(2.0) == pytest.approx(2 * 9.80665)
    assert fall(2.0, gravity=1.0, units="kept") == 2.0
    assert fall("2 s").magnitude == pytest.approx(2000 * 9.80665)
    assert str(fall("2 s", gravity="1 m/s2")) == "2000.0 millimeter"
    assert fall(0.0) == 0.0
    with pytest.raises(Unphysical, match=r"^time = -1"):
        fall(-1.0)
    with pytest.raises(AssertionError):
        fall(2.0, units="lost")


def test_an_absent_argument_may_be_none_only_where_none_is_its_default() -> None:
    assert optional(2.0) == optional(2.0, None) == 2.0
    assert optional(2.0, velocity=3.0) == 6.0
    assert optional("2 um", None).magnitude == pytest.approx(2.0)
    np.testing.assert_array_equal(optional([1.0, 2.0]), [1.0, 2.0])
    with pytest.raises(BadInput, match=r"^velocity = None"):
        weber(998.2, 0.0727, None, 60e-6)


def test_python_says_what_it_always_says_of_missing_arguments() -> None:
    with pytest.raises(TypeError, match=r"weber\(\) missing 1 required positional argument"):
        weber(998.2, 0.0727, 10.0)
    with pytest.raises(TypeError, match="unexpected keyword argument 'speed'"):
        weber(998.2, 0.0727, 10.0, speed=60e-6)
    with pytest.raises(TypeError, match="multiple values for argument 'density'"):
        weber(998.2, 0.0727, 10.0, 60e-6, density=1.0)


# --- units ---------------------------------------------------------------------------------------

# The same drop in the units of an ink room, a US plant and a laboratory.
SAME = [
    ("998.2 kg/m3", "72.7 mN/m", "10 m/s", "60 um"),
    ("0.9982 g/cc", "72.7 dyn/cm", "600 m/min", "0.06 mm"),
    ("998.2 g/L", 0.0727, (10, "m/s"), 60e-6),
    (998.2, 0.0727, 10, (60, "micron")),
    (PRIVATE.Quantity(0.9982, "g/cm^3"), "0.0727 N/m", PRIVATE.Quantity(36, "km/h"), 60e-6),
    ("62.31559024710756 lb/ft3", "72.7 mN/m", "1968.503937007874 ft/min", "2.3622047244094486 mil"),
]


@pytest.mark.parametrize("units", SAME, ids=lambda units: " ".join(map(str, units))[:40])
def test_other_units_leave_the_number_the_same(units: tuple[Any, ...]) -> None:
    assert weber(*units) == pytest.approx(SI, rel=1e-14)
    time = capillary_time(*units[:2], units[3])
    si = capillary_time.si(998.2, 0.0727, 60e-6)
    assert time.to("s").magnitude == pytest.approx(si, rel=1e-14) if units[3] != 60e-6 else True


@given(st.floats(1e-3, 1e3), st.floats(1e-3, 1e3))
def test_a_change_of_unit_is_no_change_of_result(velocity: float, microns: float) -> None:
    si = weber(998.2, 0.0727, velocity, microns * 1e-6)
    assert weber(998.2, 0.0727, f"{velocity!r} m/s", f"{microns!r} um") == pytest.approx(si)
    assert weber(998.2, 0.0727, (velocity * 60, "m/min"), (microns / 25.4, "mil")) == (
        pytest.approx(si)
    )


def test_a_unit_anywhere_gives_the_stock_unit() -> None:
    for arguments in [
        ("998.2 kg/m3", 0.0727, 60e-6),
        (998.2, "72.7 mN/m", 60e-6),
        (998.2, 0.0727, (60, "um")),
    ]:
        result = capillary_time(*arguments)
        assert str(result.units) == "microsecond"
        assert result.magnitude == pytest.approx(54.4588, rel=1e-4)  # sqrt(998.2 d^3/0.0727)
    assert type(weber("998.2 kg/m3", 0.0727, 10.0, 60e-6)) is float


def test_the_first_quantity_fixes_the_registry(application: None) -> None:
    second = pint.UnitRegistry()
    pint.set_application_registry(pint.UnitRegistry())
    application_registry = pint.get_application_registry().get()
    length, density = PRIVATE.Quantity(60, "um"), second.Quantity(1, "g/cm^3")
    assert capillary_time(density, 0.0727, length)._REGISTRY is second
    assert capillary_time(998.2, "72.7 mN/m", length)._REGISTRY is PRIVATE
    assert capillary_time(998.2, 0.0727, "60 um")._REGISTRY is application_registry
    pint.set_application_registry(second)
    assert capillary_time(998.2, 0.0727, "60 um")._REGISTRY is second


@pytest.mark.parametrize(
    ("arguments", "error", "says"),
    [
        (("4 cSt", 0.07, 1.0, 1e-4), UnitError, "density = '4 cSt': 'cSt' measures a kinematic"),
        (
            (998.2, "24 mN", 1.0, 1e-4),
            UnitError,
            "surface_tension = '24 mN': 'mN' measures a force",
        ),
        ((998.2, 0.07, "1,5 m/s", 1e-4), BadInput, "velocity = '1,5 m/s': a decimal comma"),
        ((998.2, 0.07, 1.0, -1e-4), Unphysical, "length = -0.0001 m is impossible"),
        ((998.2, 0.07, 1.0, "33 G"), UnitError, "length = '33 G': no inner diameter"),
        ((0.0, 0.07, 1.0, 1e-4), Unphysical, "density = 0 kg/m^3 is impossible"),
        ((998.2, 0.07, math.inf, 1e-4), Unphysical, "velocity = inf m/s is impossible"),
        ((True, 0.07, 1.0, 1e-4), BadInput, "density = True: a boolean is no number"),
        ((998.2, 0.07, 1j, 1e-4), BadInput, "velocity = 1j: a complex is no number"),
        ((998.2, 0.07, 1.0, np.array(["a"])), BadInput, "the array holds text"),
    ],
    ids=lambda value: str(value)[:30],
)
def test_errors_name_the_argument(arguments: Any, error: Any, says: str) -> None:
    with pytest.raises(error) as caught:
        weber(*arguments)
    assert says in str(caught.value)


# --- arrays --------------------------------------------------------------------------------------


def test_arrays_broadcast_by_numpys_rules() -> None:
    velocity, length = np.array([1.0, 2.0, 3.0]), np.array([[1e-4], [2e-4]])
    result = weber(998.2, 0.0727, velocity, length)
    np.testing.assert_allclose(result, weber.si(998.2, 0.0727, velocity, length), rtol=1e-15)
    assert result.shape == (2, 3)
    assert weber([998.2], 0.0727, 10.0, 60e-6).shape == (1,)
    assert weber(np.array([]), 0.0727, 10.0, 60e-6).shape == (0,)


def test_shapes_that_do_not_broadcast_are_bad_input() -> None:
    with pytest.raises(BadInput) as caught:
        weber(998.2, 0.0727, [1.0, 2.0], np.zeros((3,)) + 1e-4)
    message = str(caught.value)
    assert message.startswith("weber: the shapes do not broadcast: velocity (2,), length (3,)")
    assert "velocity[:, None]" in message


def test_arrays_with_units() -> None:
    si = weber.si(998.2, 0.0727, 10.0, np.array([60e-6, 80e-6]))
    for length in [
        (np.array([60, 80]), "um"),
        ([60, 80], "um"),
        ["60 um", "0.08 mm"],
        PRIVATE.Quantity([60.0, 80.0], "um"),
    ]:
        np.testing.assert_allclose(weber(998.2, "72.7 mN/m", 10, length), si, rtol=1e-14)
        time = capillary_time(998.2, "72.7 mN/m", length)
        assert time.magnitude.shape == (2,)
        assert time.magnitude[0] == pytest.approx(54.4588, rel=1e-4)


def test_int_arrays_are_computed_in_float64() -> None:
    result = weber(np.array([1000], dtype=np.int32), 1, np.array([100000], dtype=np.int32), 1)
    assert result.dtype == np.float64
    assert result[0] == 1e13  # beyond int32


def test_a_result_never_shares_memory_with_an_input() -> None:
    length = np.array([1e-3, 2e-3])
    first, _ = both(length, 1.0)
    assert not np.shares_memory(first, length)
    assert np.array_equal(first, length)
    assert optional(length).flags.writeable


def test_a_core_that_ignores_an_argument_still_gives_the_common_shape() -> None:
    length, time = both(2.0, np.array([1.0, 2.0]))
    assert length.tolist() == [2.0, 2.0]
    assert time.tolist() == [2.0, 1.0]


# --- Series --------------------------------------------------------------------------------------


def test_a_series_keeps_its_index_and_is_si() -> None:
    velocity = pd.Series([1.0, 2.0], index=["slow", "fast"], name="velocity")
    result = weber(998.2, "72.7 mN/m", velocity, 60e-6)
    assert isinstance(result, pd.Series)
    assert list(result.index) == ["slow", "fast"]
    assert result["fast"] == pytest.approx(weber(998.2, 0.0727, 2.0, 60e-6))
    length = pd.Series([60.0, 80.0], index=["a", "b"])
    time = capillary_time(998.2, "72.7 mN/m", (length, "um"))  # pint cannot hold a Series
    assert time["a"] == pytest.approx(capillary_time(998.2, 0.0727, 60e-6))
    both_of_them = both(length, velocity.set_axis(["a", "b"]))
    assert list(both_of_them[1]) == [60.0, 40.0]


def test_series_of_different_index_are_not_aligned_in_silence() -> None:
    one = pd.Series([1.0, 2.0], index=[0, 1])
    with pytest.raises(BadInput, match="the index of length differs"):
        weber(998.2, 0.0727, one, pd.Series([1e-4, 2e-4], index=[1, 0]))
    with pytest.raises(BadInput, match="do not broadcast"):
        weber(998.2, 0.0727, one, np.ones((3, 2)))
    with pytest.raises(BadInput, match="do not broadcast"):
        weber(998.2, 0.0727, one, np.ones(3))


# --- several results --------------------------------------------------------------------------


def test_several_results_each_by_its_kind() -> None:
    assert both(2.0, 4.0) == (2.0, 0.5)
    length, time = both("2 mm", 4.0)
    assert (str(length.units), str(time.units)) == ("micrometer", "microsecond")
    assert (length.magnitude, time.magnitude) == pytest.approx((2000.0, 500.0))
    result = named("2 mm", 4.0)
    assert type(result) is Pair
    assert result.wait.magnitude == pytest.approx(500.0)
    by_key = keyed("2 mm", 4.0)
    assert by_key["size"].magnitude == pytest.approx(4000.0)
    assert by_key["weber"] == 4.0
    assert regime("2 m/s") == "fast"
    assert regime(0.5) == "slow"


def test_kinds_and_results_can_be_read() -> None:
    assert weber.kinds == {
        "density": "density",
        "surface_tension": "surface_tension",
        "velocity": "velocity",
        "length": "length",
    }
    assert weber.domains["velocity"] == "any"
    assert weber.domains["length"] == "> 0"
    assert fall.kinds == {"time": "time", "gravity": "acceleration"}
    assert fall.domains["time"] == ">= 0"
    assert (weber.returns, both.returns, regime.returns) == ("ratio", ("length", "time"), None)
    assert keyed.returns == {"size": "length", "weber": "ratio"}


# --- arithmetic ------------------------------------------------------------------------------


@physical(returns="length", velocity="velocity any")
def fragile(length: float, velocity: float) -> float:
    """Fails in all the ways that arithmetic knows."""
    if isinstance(velocity, np.ndarray):
        return typing.cast(float, length / velocity**0.5)
    if velocity == 2.0:
        return math.sqrt(-length)
    if velocity == 3.0:
        return math.exp(1e6)
    return typing.cast(float, length / velocity**0.5)


@pytest.mark.parametrize("velocity", [0.0, -1.0, 2.0, 3.0, 1e-320])
def test_arithmetic_that_fails_is_nan_with_one_warning(velocity: float) -> None:
    length = 1e300 if velocity == 1e-320 else 1.0
    with pytest.warns(DropkitWarning, match=r"fragile: 1 result\(s\) had no finite value") as seen:
        assert math.isnan(fragile(length, velocity))
    assert len(seen) == 1
    assert seen[0].filename == __file__
    with pytest.warns(DropkitWarning):
        assert math.isnan(fragile(f"{length!r} m", velocity).magnitude)


def test_arrays_name_how_many_failed() -> None:
    with pytest.warns(DropkitWarning, match=r"fragile: 2 result\(s\)") as seen:
        result = fragile(np.array([1.0, 1.0, np.nan, 1.0]), np.array([0.0, 4.0, 0.0, -1.0]))
    np.testing.assert_array_equal(result, [np.nan, 0.5, np.nan, np.nan])
    assert len(seen) == 1
    assert seen[0].filename == __file__


def test_several_results_fail_together() -> None:
    with pytest.warns(DropkitWarning, match=r"both: 2 result\(s\)"):
        assert all(math.isnan(value) for value in both(1.0, 0.0))
    with pytest.warns(DropkitWarning, match=r"both: 1 result\(s\)"):
        _, time = both(1.0, np.array([0.0, 2.0]))
    np.testing.assert_array_equal(time, [np.nan, 0.5])


@physical(returns="length")
def ranged(length: float, *, outside: str = "raise") -> float:
    """A core with the range policy."""
    if np.any(np.greater(length, 1.0)):
        if outside == "raise":
            raise OutOfRange("length out of range")
        return typing.cast(float, np.where(np.greater(length, 1.0), np.nan, length))
    return length


def test_the_cores_own_errors_pass_and_a_nan_that_was_asked_for_is_silent() -> None:
    with pytest.raises(OutOfRange):
        ranged(2.0)
    with pytest.raises(OutOfRange):
        ranged("2 m")
    with warnings.catch_warnings():
        warnings.simplefilter("error")
        assert math.isnan(ranged(2.0, outside="nan"))
        np.testing.assert_array_equal(ranged([0.5, 2.0], outside="nan"), [0.5, np.nan])
    with pytest.warns(DropkitWarning):
        assert math.isnan(ranged(2.0, outside="warn"))


def test_faults_of_a_core_are_not_hidden() -> None:
    @physical(returns="ratio")
    def wrong(length: float) -> float:
        raise ValueError("no such regime")

    with pytest.raises(ValueError, match="no such regime"):
        wrong(1.0)
    with pytest.raises(ValueError, match="no such regime"):
        wrong("1 m")


# --- declared at once --------------------------------------------------------------------------


def test_an_argument_without_a_kind_raises_at_decoration() -> None:
    with pytest.raises(TypeError, match=r"the argument 'speed' has no kind.*speed=\"length > 0\""):

        @physical(returns="ratio")
        def one(speed: float) -> float:
            return speed

    with pytest.raises(TypeError, match="'factor' has no kind"):

        @physical(returns="ratio")
        def two(length: float, *, factor: float = 1.0) -> float:
            return length

    with pytest.raises(TypeError, match="'shape' has no kind"):

        @physical(returns="ratio")
        def three(length: float, shape: str) -> float:
            return length


@pytest.mark.parametrize(
    ("options", "says"),
    [
        ({"length": "lenght"}, "no kind of quantity is called 'lenght'.*'length'"),
        ({"length": "length < 0"}, "domain '< 0' is not known"),
        ({"velocity": "velocity"}, "no argument is called velocity"),
        ({"returns": "lenght"}, "returns: no kind of quantity is called 'lenght'"),
        ({"returns": ("length", "tiem")}, "'tiem'"),
        ({"returns": {"a": "tiem"}}, "'tiem'"),
    ],
)
def test_a_wrong_declaration_raises_at_decoration(options: dict[str, Any], says: str) -> None:
    def core(length: float) -> float:
        return length

    with pytest.raises(TypeError, match=says):
        physical(**options)(core)


def test_arguments_that_cannot_be_named_raise_at_decoration() -> None:
    def starred(*length: float) -> float:
        return length[0]

    def positional(length: float, /) -> float:
        return length

    for core in (starred, positional):
        with pytest.raises(TypeError, match="cannot be called by name"):
            physical(returns="ratio")(core)


def test_options_can_be_declared_as_such() -> None:
    @physical(returns="length", mode=None, count="ratio > 0")
    def with_mode(length: float, mode: str, count: float = 1.0) -> float:
        return length * count if mode == "many" else length

    assert with_mode(2.0, "many", 3.0) == 6.0
    assert with_mode("2 um", "one").magnitude == pytest.approx(2.0)
    assert "mode" not in with_mode.kinds


# --- looks like the function ---------------------------------------------------------------------


def test_name_help_and_signature_are_kept() -> None:
    signature = inspect.signature(weber)
    assert signature == inspect.signature(weber.si)
    assert list(signature.parameters) == ["density", "surface_tension", "velocity", "length"]
    assert weber.__name__ == "weber"
    assert weber.__module__ == __name__
    assert inspect.getdoc(weber) == inspect.getdoc(weber.si)
    assert inspect.unwrap(weber) is weber.si
    assert isinstance(weber, Boundary)
    shown = pydoc.plain(pydoc.render_doc(weber))
    assert "Inertia over surface tension, on the diameter." in shown
    assert "weber(density, surface_tension, velocity, length)" in shown
    assert typing.get_type_hints(inspect.unwrap(weber))["density"] is float


def test_it_copies_and_pickles_by_reference() -> None:
    assert pickle.loads(pickle.dumps(weber)) is weber
    assert copy.copy(weber) is weber
    assert copy.deepcopy(weber) is weber
    assert b"weber" in pickle.dumps(weber)
    assert len(pickle.dumps(weber)) < 200


def run(code: str, cwd: Path) -> str:
    """Output of a fresh interpreter that treats warnings as errors."""
    done = subprocess.run(
        [sys.executable, "-W", "error", "-c", textwrap.dedent(code)],
        capture_output=True,
        text=True,
        check=False,
        cwd=cwd,
    )
    assert done.returncode == 0, done.stderr
    return done.stdout


MODULE = '''
from dropkit.boundary import physical


@physical(returns="length")
def travel(velocity: float, time: float) -> float:
    """Distance in a time.

    Examples
    --------
    >>> travel(2.0, 3.0)
    {answer}
    """
    return velocity * time
'''


def test_it_pickles_into_a_process_that_has_not_loaded_dropkit(tmp_path: Path) -> None:
    (tmp_path / "made_up_model.py").write_text(MODULE.format(answer=6.0))
    dump = "import pickle, made_up_model as m; open('it', 'wb').write(pickle.dumps([m.travel]))"
    run(dump, tmp_path)
    out = run(
        """
        import pickle, sys
        assert not any(name.startswith("dropkit") for name in sys.modules)
        (travel,) = pickle.load(open("it", "rb"))
        print(travel(2.0, 3.0), travel("2 m/s", 3.0), travel.si(2.0, 3.0))
        """,
        tmp_path,
    )
    assert out.split("\n")[0] == "6.0 6000000.0 micrometer 6.0"


def test_doctest_finds_the_examples(tmp_path: Path) -> None:
    for name, answer in (("right", 6.0), ("wrong", 7.0)):
        (tmp_path / f"made_up_{name}.py").write_text(MODULE.format(answer=answer))
    done = subprocess.run(
        [sys.executable, "-m", "pytest", "-q", "-p", "no:cacheprovider", "--doctest-modules"]
        + [str(page) for page in sorted(tmp_path.glob("*.py"))],
        capture_output=True,
        text=True,
        check=False,
        cwd=tmp_path,
    )
    assert "1 failed, 1 passed" in done.stdout
    assert "made_up_wrong.travel" in done.stdout


TYPED = """
from typing import Any, assert_type

import numpy as np

from dropkit.boundary import Boundary, physical


@physical(returns="ratio")
def weber(density: float, surface_tension: float, velocity: float, length: float) -> float:
    return density * velocity**2 * length / surface_tension


@physical(returns=("length", "time"))
def both(length: float, *, time: float = 1.0) -> tuple[float, float]:
    return length, time


assert_type(weber(1.0, 1.0, 1.0, 1.0), float)
assert_type(weber(density=1.0, surface_tension=1, velocity=1.0, length=1.0), float)
assert_type(weber("1 g/cm3", 1.0, 1.0, 1.0), Any)
assert_type(weber(np.zeros(2), 1.0, 1.0, 1.0), Any)
assert_type(weber.si(1.0, 1.0, 1.0, 1.0), float)
assert_type(weber.si(np.zeros(2), 1.0, 1.0, 1.0), Any)
assert_type(both(1.0, time=2.0), tuple[float, float])
assert_type(both("1 um"), Any)
"""


def test_floats_are_typed_exactly_and_the_rest_is_any(
    tmp_path: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    monkeypatch.chdir(ROOT)  # the package's own settings, and what its type check has cached
    page = tmp_path / "typed.py"
    page.write_text(TYPED)
    out, errors, code = mypy.run([str(page)])
    assert (errors, code) == ("", 0), out


# --- anything --------------------------------------------------------------------------------

VALUES = st.one_of(
    st.floats(), st.integers(), st.none(), st.booleans(), st.text(max_size=6),
    st.complex_numbers(), st.lists(st.floats(), max_size=3), st.dictionaries(st.text(), st.none()),
    st.sampled_from(["60 um", "10 m/s", "1 g/cm3", "72 mN/m", "4 cSt", (1.0, "m/s"), [1.0, "um"]]),
    st.sampled_from([PRIVATE.Quantity(1.0, "m/s"), PRIVATE.Quantity([1.0, 2.0], "um")]),
    st.sampled_from([np.ones(2), np.ones((2, 1)), np.array([np.nan, 1e300]), np.array(["a"])]),
    st.sampled_from([pd.Series([1.0, 2.0]), pd.Series(["a"]), pd.DataFrame()]),
)  # fmt: skip


def outcome(function: Any, arguments: tuple[Any, ...]) -> Any:
    """The result, or the error of ours; anything else passes through."""
    with warnings.catch_warnings():
        warnings.simplefilter("error")
        warnings.simplefilter("ignore", DropkitWarning)
        try:
            return function(*arguments)
        except DropkitError as error:
            return error


@given(arguments=st.tuples(VALUES, VALUES, VALUES))
def test_anything_gives_a_number_or_an_error_of_ours(arguments: tuple[Any, ...]) -> None:
    found = outcome(capillary_time, arguments)
    if isinstance(found, DropkitError):
        assert str(found)
    else:
        plain = getattr(found, "magnitude", found)
        assert not np.isinf(np.asarray(plain, dtype=float)).any()
        assert not (np.asarray(plain, dtype=float) < 0).any()


@given(st.lists(st.floats(1e-6, 1e6), min_size=4, max_size=4))
def test_the_quick_way_and_the_long_way_agree(values: list[float]) -> None:
    quick = weber(*values)
    assert quick == weber(*map(np.float64, values))
    assert quick == pytest.approx(weber(*([value] for value in values))[0], rel=1e-14)
    assert quick == weber.si(*values)
