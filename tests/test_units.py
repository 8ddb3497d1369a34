"""Every form of input becomes SI, every result comes back as it was asked for."""

from __future__ import annotations

import copy
import decimal
import fractions
import gc
import math
import pickle
import subprocess
import sys
import textwrap
import weakref
from collections.abc import Iterator
from typing import Any

import numpy as np
import pandas as pd
import pint
import pytest
from hypothesis import given
from hypothesis import strategies as st
from hypothesis.extra import numpy as npst

from dropkit.errors import BadInput, DropkitError, ImplausibleValue, UnitError, Unphysical
from dropkit.unit_table import KINDS
from dropkit.units import Asked, give, kelvin_hint, read, to_si

PRIVATE = pint.UnitRegistry()
STOCKED = sorted(name for name, kind in KINDS.items() if kind.si)


def carried(value: Any, kind: str = "length") -> Asked:
    """The note on units of a value that has one."""
    asked = read(value, kind, "x")[1]
    assert asked is not None
    return asked


# --- scalars and arrays ----------------------------------------------------------------------


@pytest.mark.parametrize(
    "value",
    [
        2.0,
        2,
        np.float64(2),
        np.float32(2),
        np.float16(2),
        np.longdouble(2),
        np.int8(2),
        np.uint64(2),
        np.array(2.0),
        np.array(2),
        np.array(2.0, dtype=">f8"),
        fractions.Fraction(2),
        decimal.Decimal(2),
        "2 m",
        (2, "m"),
        (np.array(2), "m"),
        PRIVATE.Quantity(2, "m"),
        PRIVATE.Quantity(np.array(2), "m"),
        PRIVATE.Quantity(np.float32(2), "m"),
    ],
    ids=repr,
)
def test_every_scalar_gives_a_float(value: Any) -> None:
    si, _ = read(value, "length", "x")
    assert type(si) is float
    assert si == 2.0


@pytest.mark.parametrize(
    ("value", "shape"),
    [
        ([1, 2, 3], (3,)),
        ((1.0, 2.0, 3.0), (3,)),
        (range(1, 4), (3,)),
        ([[1, 2], [3, 4]], (2, 2)),
        ([np.float32(1), 2], (2,)),
        ([decimal.Decimal(1), fractions.Fraction(2)], (2,)),
        ([np.array([1, 2]), [3, 4]], (2, 2)),
        (np.array([1, 2, 3]), (3,)),
        (np.array([[1, 2, 3]], dtype=np.uint8), (1, 3)),
        (np.array([1, 2], dtype=np.float32), (2,)),
        (np.ma.array([1.0, 2.0], mask=[False, False]), (2,)),
        (np.array([]), (0,)),
        ([], (0,)),
        ((np.array([1, 2]), "m"), (2,)),
        (([1, 2], "m"), (2,)),
        ((range(1, 3), "m"), (2,)),
        (["1 m", "2 m"], (2,)),
        (("1 m", "2 m"), (2,)),
        ([["1 m", "2 m"], ["3 m", "400 cm"]], (2, 2)),
        ([(1, "m"), "2 m", PRIVATE.Quantity(3, "m")], (3,)),
        (PRIVATE.Quantity([1, 2], "m"), (2,)),
        ([PRIVATE.Quantity(1, "m"), PRIVATE.Quantity(2, "m")], (2,)),
    ],
    ids=repr,
)
def test_every_array_gives_float64(value: Any, shape: tuple[int, ...]) -> None:
    si, _ = read(value, "length", "x")
    assert type(si) is np.ndarray
    assert si.dtype == np.float64
    assert si.shape == shape
    assert si.ravel().tolist() == list(range(1, si.size + 1))


def test_a_float64_array_is_not_copied_and_never_changed() -> None:
    array = np.array([1.0, 2.0])
    assert read(array, "length", "x")[0] is array
    give(read((array, "um"), "length", "x")[0], "length", carried("1 um"))
    assert array.tolist() == [1.0, 2.0]


def test_nan_passes_as_nan() -> None:
    for value in (math.nan, np.nan, np.array(np.nan), (math.nan, "um"), decimal.Decimal("nan")):
        assert math.isnan(read(value, "length", "x")[0])
    assert np.isnan(read([0.1, np.nan], "length", "x", plausible=True)[0]).tolist() == [False, True]


@pytest.mark.parametrize(
    ("value", "says"),
    [
        (True, "a boolean is no number"),
        (np.True_, "a boolean is no number"),
        ([True, 1.0], "a boolean is no number"),
        ((True, "um"), "a boolean is no number"),
        (np.array([True]), "the array holds booleans"),
        (1j, "a complex is no number"),
        (np.complex128(1), "a complex128 is no number"),
        ([1.0, 1j], "a complex is no number"),
        (np.array([1j]), "the array holds complex numbers"),
        (None, "a NoneType is no number"),
        ([None], "a NoneType is no number"),
        ({}, "a dict is no number"),
        ({1.0}, "a set is no number"),
        (b"60 um", "a bytes is no number"),
        (object(), "a object is no number"),
        (np.array([object()]), "the array holds objects"),
        (np.array(["60 um"]), "the array holds text"),
        (np.array(["2020-01-01"], dtype="datetime64[D]"), "the array holds dates"),
        (np.timedelta64(1, "s"), "a timedelta64 is no number"),
        ([np.timedelta64(1, "s")], "a timedelta64 is no number"),
        ([np.True_, 1.0], "a boolean is no number"),
        (np.zeros(2, dtype=[("a", float)]), "the array holds records"),
        (np.ma.array([1.0, 2.0], mask=[True, False]), "masked elements"),
        (pd.DataFrame({"a": [1.0]}), "a DataFrame is no number"),
        (pd.Index([1.0]), "a Index is no number"),
        (pd.NA, "a NAType is no number"),
        (pd.Timestamp(0), "a Timestamp is no number"),
        (PRIVATE.um, "a Unit is no number"),
        ([1.0, "60 um"], "a list mixes a number and text"),
        ([60, "um"], "a list mixes a number and text"),
        (["60 um", 1.0], "some elements carry a unit and some do not"),
        (("60", "um"), "its number is text"),
        (("60 um", "um"), "its number is text"),
        ((PRIVATE.Quantity(1, "um"), "um"), "two units"),
        ((["60 um"], "um"), "two units"),
        ([[1, 2], [3]], "its elements differ in shape"),
        ([[1, 2], 3], "its elements differ in shape"),
        (["60 um", "1,5 um"], "a decimal comma"),
        (("60 um", "1.5 mm", "x"), "does not start with a number"),
    ],
    ids=lambda value: repr(value)[:40].partition(" at 0x")[0],
)
def test_other_forms_are_bad_input(value: Any, says: str) -> None:
    with pytest.raises(BadInput) as caught:
        read(value, "length", "nozzle_diameter")
    assert type(caught.value) is BadInput
    message = str(caught.value)
    assert message.startswith("nozzle_diameter = ")
    assert says in message
    if "comma" not in says and "start" not in says:
        assert "Allowed: a number or array in m, or a length in m or um, such as '1 um'" in message


def test_a_list_in_itself_is_bad_input() -> None:
    endless: list[Any] = []
    endless.append(endless)
    with pytest.raises(BadInput, match="nested more than 16 deep"):
        read(endless, "length", "x")


@pytest.mark.parametrize(
    ("value", "domain"),
    [
        (math.inf, "any"),
        (-math.inf, "any"),
        (np.array([1.0, np.inf]), "any"),
        ([1.0, -math.inf], "any"),
        (10**400, "any"),
        ([10**400], "any"),
        (fractions.Fraction(10**400), "any"),
        (np.longdouble("1e400"), "any"),
        (0.0, "> 0"),
        (-1.0, ">= 0"),
        (np.array([1.0, 0.0]), "> 0"),
        (1.5, "0..1"),
        (np.array([0.5, 1.5]), "0..1"),
        (PRIVATE.Quantity(-1, "um"), "> 0"),
    ],
    ids=repr,
)
def test_outside_the_domain_is_unphysical(value: Any, domain: Any) -> None:
    with pytest.raises(Unphysical, match=r"^x"):
        read(value, "length", "x", domain=domain)


def test_the_ends_of_the_domains_belong_to_them() -> None:
    assert read(0.0, "length", "x", domain=">= 0")[0] == 0.0
    assert read(1.0, "humidity", "x")[0] == 1.0
    assert read(np.array([0.0, 1.0]), "humidity", "x")[0].tolist() == [0.0, 1.0]
    assert read(-3.0, "velocity", "x")[0] == -3.0
    assert read(5e-324, "length", "x")[0] == 5e-324


# --- Series --------------------------------------------------------------------------------------


def test_a_series_is_si_and_keeps_its_index() -> None:
    series = pd.Series([1, 2], index=["a", "b"], name="d")
    si, asked = read(series, "length", "x")
    assert asked is None
    assert si.dtype == np.float64
    assert list(si.index) == ["a", "b"]
    assert si.name == "d"
    si, _ = read(pd.Series([1.0, None], dtype="Float64"), "length", "x")
    assert np.isnan(si.iloc[1])
    assert give(si, "length", carried("1 um")) is si


@pytest.mark.parametrize(
    "series",
    [
        pd.Series(["60 um"]),
        pd.Series([True]),
        pd.Series([1j]),
        pd.Series([None, "a"]),
        pd.Series(pd.to_datetime(["2020-01-01"])),
        pd.Series(["a"], dtype="category"),
    ],
    ids=lambda series: str(series.dtype),
)
def test_a_series_of_something_else_is_bad_input(series: Any) -> None:
    with pytest.raises(BadInput, match="the Series holds"):
        read(series, "length", "x")


def test_a_series_outside_its_domain_is_unphysical() -> None:
    with pytest.raises(Unphysical, match=r"x has 1 of 2 elements"):
        read(pd.Series([1.0, -1.0]), "length", "x")


# --- Quantities ----------------------------------------------------------------------------------

UNITS_OF_PINT = [
    ("um", "length", 1e-6),
    ("inch", "length", 0.0254),
    ("g/cm^3", "density", 1000.0),
    ("centipoise", "viscosity", 1e-3),
    ("dyn/cm", "surface_tension", 1e-3),
    ("psi", "pressure", 6894.757293168361),
    ("kg/hour", "mass_flow", 1 / 3600),
    ("kHz", "frequency", 1e3),
    ("rpm", "frequency", 1 / 60),
    ("radian/second", "frequency", 1 / (2 * math.pi)),
    ("revolution/minute", "frequency", 1 / 60),
    ("uS/cm", "electrical_conductivity", 1e-4),
    ("kV/cm", "electric_field", 1e5),
    ("pC", "charge", 1e-12),
    ("percent", "mass_fraction", 0.01),
    ("dimensionless", "mass_fraction", 1.0),
    ("degree", "angle", math.pi / 180),
    ("kelvin", "temperature", 1.0),
    ("millikelvin", "temperature_difference", 1e-3),
    ("delta_degF", "temperature_difference", 5 / 9),
    ("W/(m*delta_degC)", "thermal_conductivity", 1.0),
]


@pytest.mark.parametrize(("unit", "kind", "factor"), UNITS_OF_PINT)
def test_quantities_of_a_private_registry(unit: str, kind: str, factor: float) -> None:
    si, asked = read(PRIVATE.Quantity(0.7, unit), kind, "x")
    assert si == pytest.approx(0.7 * factor, rel=1e-14)
    assert asked is not None
    assert asked.registry is PRIVATE


def test_temperatures_have_their_zero() -> None:
    for unit, value, kelvin in [
        ("degC", 25.0, 298.15),
        ("degF", 77.0, 298.15),
        ("degR", 491.67, 273.15),
        ("degRe", 20.0, 298.15),
    ]:
        si = to_si(PRIVATE.Quantity(value, unit), "temperature")
        assert si == pytest.approx(kelvin, rel=1e-14)
    array = to_si(PRIVATE.Quantity(np.array([0.0, 100.0]), "degC"), "temperature")
    assert array.tolist() == [273.15, 373.15]


@pytest.mark.parametrize(
    ("unit", "kind", "says"),
    [
        ("delta_degC", "temperature", "'25 degC'"),
        ("degC", "temperature_difference", "'5 K'"),
        ("cSt", "viscosity", "Multiply it by the density"),
        ("rpm", "shear_rate", "a frequency"),
        ("degree", "mass_fraction", "An angle is no fraction"),
        ("decibel", "ratio", "no linear unit"),
        ("pixel", "length", "cannot be turned into SI"),
        ("meter ** 0.5", "length", "cannot be turned into SI"),
        ("second", "length", "measures a time"),
        ("dimensionless", "length", "measures a pure number"),
    ],
)
def test_unsuitable_quantities_are_refused(unit: str, kind: str, says: str) -> None:
    with pytest.raises(UnitError, match=r"^x = <Quantity") as caught:
        read(PRIVATE.Quantity(1.0, unit), kind, "x")
    assert says in str(caught.value)


def test_other_defaults_of_a_registry_do_not_matter() -> None:
    other = pint.UnitRegistry(system="imperial", autoconvert_offset_to_baseunit=True)
    other.formatter.default_format = "~P"
    assert to_si(other.Quantity(1.0, "inch"), "length") == pytest.approx(0.0254)
    assert to_si(other.Quantity(25.0, "degC"), "temperature") == 298.15
    assert give(60e-6, "length", carried(other.Quantity(1.0, "inch"))).to("inch").magnitude == (
        pytest.approx(60e-6 / 0.0254)
    )


def test_a_unit_that_is_redefined_later_is_not_remembered() -> None:
    own = pint.UnitRegistry(on_redefinition="ignore")
    own.define("blob = 3 um")
    assert to_si(own.Quantity(2.0, "blob"), "length") == pytest.approx(6e-6)
    context = pint.Context("big")
    context.redefine("blob = 5 um")
    own.add_context(context)
    with own.context("big"):
        assert to_si(own.Quantity(2.0, "blob"), "length") == pytest.approx(10e-6)
    assert to_si(own.Quantity(2.0, "blob"), "length") == pytest.approx(6e-6)


# --- results -------------------------------------------------------------------------------------


@pytest.fixture
def application() -> Iterator[None]:
    """Puts pint's application registry back after a test has changed it."""
    before = pint.get_application_registry().get()
    yield
    pint.set_application_registry(before)


def test_bare_input_gives_bare_results() -> None:
    assert give(60e-6, "length", None) == 60e-6
    assert give(0.5, "ratio", carried("60 um")) == 0.5
    assert give(0.5, "humidity", carried("60 um")) == 0.5


@pytest.mark.parametrize("name", STOCKED)
def test_results_come_in_the_stock_unit_of_pint(name: str) -> None:
    kind = KINDS[name]
    result = give(0.7 * kind.per_stock + kind.zero, name, carried("60 um"))
    assert result.units == pint.get_application_registry().Unit(kind.stock)
    assert result.magnitude == pytest.approx(0.7, rel=1e-9)
    back = result.to(pint.get_application_registry().Unit(kind.si)).magnitude
    assert back == pytest.approx(0.7 * kind.per_stock + kind.zero, rel=1e-12)


@given(name=st.sampled_from(STOCKED), value=st.floats(1e-6, 1e6))
def test_there_and_back(name: str, value: float) -> None:
    """Value with its unit -> SI -> stock unit -> SI."""
    kind = KINDS[name]
    si, asked = read(PRIVATE.Quantity(value, kind.stock), name, "x")
    result = give(si, name, asked)
    assert result._REGISTRY is PRIVATE
    assert result.magnitude == pytest.approx(value, rel=1e-12, abs=1e-12 * kind.zero)
    assert read(result, name, "x")[0] == pytest.approx(si, rel=1e-14)


@given(value=npst.arrays(np.float64, npst.array_shapes(max_dims=3), elements=st.floats(0.1, 1e3)))
def test_arrays_there_and_back(value: Any) -> None:
    si, asked = read((value, "mPa*s"), "viscosity", "x")
    result = give(si, "viscosity", asked)
    assert result.magnitude.shape == value.shape
    np.testing.assert_allclose(result.magnitude, value, rtol=1e-14)


def test_the_application_registry_is_looked_up_at_each_call(application: None) -> None:
    first = give(1e-6, "length", carried("60 um"))
    other = pint.UnitRegistry()
    other.define("bucket_of_ink = 12 L")
    pint.set_application_registry(other)
    second = give(1e-6, "length", carried("60 um"))
    assert first._REGISTRY is not other
    assert second._REGISTRY is other
    assert second + other.Quantity(1.0, "um") == other.Quantity(2.0, "um")
    # A unit of the new registry is read, and forgotten with it.
    assert to_si("2 bucket_of_ink", "volume") == pytest.approx(0.024)
    third = pint.UnitRegistry()
    third.define("bucket_of_ink = 10 L")
    pint.set_application_registry(third)
    assert to_si("2 bucket_of_ink", "volume") == pytest.approx(0.020)
    pint.set_application_registry(pint.UnitRegistry())
    with pytest.raises(UnitError, match="'bucket_of_ink' is not known"):
        to_si("2 bucket_of_ink", "volume")


def test_a_lazy_application_registry_is_completed(application: None) -> None:
    pint.set_application_registry(pint.LazyRegistry())
    assert give(1e-6, "length", carried("60 um")).magnitude == pytest.approx(1.0)


def test_asked_holds_its_registry_weakly_and_travels_without() -> None:
    own: Any = pint.UnitRegistry()
    asked = carried(own.Quantity(1.0, "um"))
    assert asked.registry is own
    assert repr(asked) == "Asked(<registry>)"
    for other in (pickle.loads(pickle.dumps(asked)), copy.deepcopy(asked)):
        assert other.registry is None
        assert give(1e-6, "length", other).magnitude == pytest.approx(1.0)
    alive = weakref.ref(own)
    del own
    gc.collect()
    if alive() is None:  # pint may keep cycles alive for a while
        assert asked.registry is None
        assert give(1e-6, "length", asked).magnitude == pytest.approx(1.0)


# --- plausibility ------------------------------------------------------------------------------

SLIPS = [
    ("24 N/m", "surface_tension", "24 mN/m was probably meant, which is 0.024 N/m"),
    (31.0, "surface_tension", "31 mN/m was probably meant"),
    (1.05, "density", "1.05 g/cm3 was probably meant, which is 1050 kg/m^3"),
    (2e-6, "viscosity", "kinematic viscosity"),
    (4200.0, "viscosity", "4200 mPa*s was probably meant"),
    (4.0, "kinematic_viscosity", "4 cSt was probably meant"),
    (2257.0, "heat_of_vaporisation", "2257 kJ/kg was probably meant"),
    (4.18, "heat_capacity", "4.18 kJ/(kg*K) was probably meant"),
    (600.0, "thermal_conductivity", "600 mW/(m*K) was probably meant"),
    (0.25, "diffusivity_in_air", "0.25 cm2/s was probably meant"),
    (25.0, "diffusivity_in_air", "25 mm2/s was probably meant"),
    (1.482, "speed_of_sound", "1.482 km/s was probably meant"),
    (18.0, "molar_mass", "18 g/mol was probably meant"),
    (110.0, "drop_diameter", "110 um was probably meant, which is 0.00011 m"),
    (45.0, "contact_angle", "45 deg was probably meant"),
    (25.0, "temperature", "kelvin expected; 25 degC is 298.15"),
    (np.array([298.0, 25.0]), "temperature", "(1 of 2 elements)"),
    (pd.Series([298.0, 25.0]), "temperature", "kelvin expected"),
    (["24 N/m", "31 N/m"], "surface_tension", "24 mN/m was probably meant"),
]


@pytest.mark.parametrize(("value", "word", "says"), SLIPS, ids=lambda value: repr(value)[:30])
def test_likely_slips_are_named(value: Any, word: str, says: str) -> None:
    with pytest.raises(ImplausibleValue) as caught:
        read(value, word, "x", plausible=True)
    message = str(caught.value)
    assert message.startswith("x = ")
    assert says in message
    assert "plausible=False lets it pass" in message
    assert read(value, word, "x")[0] is not None  # without the windows it is only a number


def test_a_cold_temperature_with_its_unit_is_meant() -> None:
    assert read("77 K", "temperature", "x", plausible=True)[0] == 77.0
    with pytest.raises(ImplausibleValue, match="kelvin expected"):
        read(77.0, "temperature", "x", plausible=True)


def test_impossible_temperatures_remind_of_kelvin_if_bare() -> None:
    with pytest.raises(Unphysical, match=r"kelvin expected; -5 degC is 268\.15"):
        read(-5.0, "temperature", "T")
    with pytest.raises(Unphysical, match=r"kelvin expected; 0 degC is 273\.15"):
        read(np.array([300.0, 0.0]), "temperature", "T")
    with pytest.raises(Unphysical) as caught:
        read("-300 degC", "temperature", "T")
    message = str(caught.value)
    assert message.startswith("T = -26.85 K (given as '-300 degC') is impossible")
    assert "kelvin expected" not in message


def test_percent_for_a_fraction_is_named() -> None:
    for value in (38.0, [0.2, 38.0], np.array([38.0]), "38"):
        with pytest.raises(Unphysical, match=r"Per cent are written '38 %', a fraction 0\.38"):
            read(value, "mass_fraction", "glycerol")


def test_kelvin_hint() -> None:
    assert kelvin_hint(300.0) == ""
    assert kelvin_hint(math.nan) == ""
    assert kelvin_hint(np.array([300.0, 20.0, 10.0])) == "kelvin expected; 20 degC is 293.15"


# --- anything ------------------------------------------------------------------------------------

ATOMS = st.one_of(
    st.none(), st.booleans(), st.integers(), st.floats(), st.complex_numbers(), st.text(max_size=8),
    st.binary(max_size=4), st.decimals(), st.fractions(), st.dates(),
    st.sampled_from(["60 um", "1 mm", "4 cSt", "25 degC", "um", "38 %"]),
    st.sampled_from([PRIVATE.Quantity(1.0, "um"), PRIVATE.Quantity([1.0], "s"), PRIVATE.um]),
)  # fmt: skip
ARRAYS = npst.arrays(
    st.one_of(npst.scalar_dtypes(), st.just(np.dtype(object))), npst.array_shapes(min_dims=0)
)
ANYTHING = st.recursive(
    st.one_of(ATOMS, ARRAYS),
    lambda inner: st.one_of(
        st.lists(inner, max_size=4),
        st.tuples(inner, inner),
        st.dictionaries(st.text(max_size=2), inner, max_size=2),
        st.tuples(inner, st.sampled_from(["um", "mPa*s", "%", "", "x"])),
    ),
    max_leaves=8,
)


def outcome(value: Any, name: str, plausible: bool) -> Any:
    """The SI value, or the error of ours; anything else passes through."""
    try:
        return read(value, name, "x", plausible=plausible)[0]
    except DropkitError as error:
        return error


@given(value=ANYTHING, name=st.sampled_from(sorted(KINDS)), plausible=st.booleans())
def test_anything_is_a_number_or_an_error_of_ours(value: Any, name: str, plausible: bool) -> None:
    found = outcome(value, name, plausible)
    if isinstance(found, DropkitError):
        assert isinstance(found, BadInput)
        assert str(found).startswith("x")
    elif type(found) is not float:
        assert isinstance(found, np.ndarray)
        assert found.dtype == np.float64
        assert found.ndim > 0
        assert not np.isinf(found).any()
    else:
        assert not math.isinf(found)


# --- a cold start ----------------------------------------------------------------------------------


def run(code: str) -> str:
    """Output of a fresh interpreter that treats warnings as errors."""
    done = subprocess.run(
        [sys.executable, "-W", "error", "-c", textwrap.dedent(code)],
        capture_output=True,
        text=True,
        check=False,
    )
    assert done.returncode == 0, done.stderr
    return done.stdout


def test_bare_numbers_load_no_pint_and_no_pandas() -> None:
    out = run(
        """
        import sys
        from dropkit.units import read, give
        give(read(60e-6, "length", "x")[0], "length", None)
        read([1.0, 2.0], "length", "x")
        light = {"pint", "pandas", "scipy", "decimal", "dropkit.unit_text"} & set(sys.modules)
        read("60 um", "length", "x")
        read(([1, 2], "mPa*s"), "viscosity", "x")
        print(sorted(light), sorted({"pint", "pandas"} & set(sys.modules)))
        """
    )
    assert out.strip() == "[] []"


def test_sixteen_threads_at_a_cold_start() -> None:
    # Pint's own first use from 16 threads fails in 15 of them: a lock guards ours.
    out = run(
        """
        import sys, threading, time
        from dropkit.units import read, give

        sys.setswitchinterval(1e-6)
        barrier = threading.Barrier(16)
        found, failed = [], []

        def work(number):
            barrier.wait()
            try:
                for turn in range(20):
                    si, asked = read(f"{60 + number} um", "length", "x")
                    result = give(si, "length", asked)
                    far = read(f"{turn + 1} furlong", "distance", "x")[0]
                    again = read(give(far, "distance", asked), "distance", "x")[0]
                    assert abs(again / far - 1) < 1e-12
                found.append((number, round(result.magnitude, 9), str(result.units)))
            except Exception as error:
                failed.append(repr(error))

        assert "pint" not in sys.modules
        threads = [threading.Thread(target=work, args=(n,)) for n in range(16)]
        for thread in threads:
            thread.start()
        for thread in threads:
            thread.join()
        print(failed)
        print(sorted(found) == [(n, 60.0 + n, "micrometer") for n in range(16)])
        """
    )
    assert out.split("\n")[:2] == ["[]", "True"]
