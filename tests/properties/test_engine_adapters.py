"""CoolProp and thermo by CAS number: values, ranges, arrays, threads, pickles.

Reference figures carry their source. "ThermoML" is the NIST/TRC ThermoML archive, with the DOI of
the paper (or journal, volume, pages); where several papers give a point, the middle one is taken.
"""

from __future__ import annotations

import contextlib
import math
import pickle
import subprocess
import sys

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import records
from dropkit.errors import (
    BadInput,
    DropkitError,
    EngineError,
    MissingProperty,
    UnknownName,
)
from dropkit.properties.engines import (
    EngineCurve,
    check_cas,
    engine_curve,
    engine_curves,
    engine_properties,
)
from dropkit.properties.engines import handbook_tables as tables
from dropkit.properties.engines.thermo_adapter import METHODS, handbook_curve
from dropkit.properties.property_words import PROPERTIES

METHOD = {(m.quantity, m.method): m for m in METHODS}


# ------------------------------------------------ asked by CAS number only
@pytest.mark.parametrize(
    "name",
    # The first two are the engines' own slips: o-xylene and pentaethylene glycol came back.
    [
        "xylene",
        "PEG400",
        "water",
        "CycloHexane",
        "AIR.PPF",
        "R410A.PPF",
        "7782-39-0o",
        "",
        "110827",
    ],
)
def test_names_are_refused(name):
    with pytest.raises(BadInput, match="CAS number only"):
        engine_curve(name, "density")


@pytest.mark.parametrize("cas", [None, 110827, 1.5, True, b"110-82-7", ["110-82-7"], " 110-82-7"])
def test_what_is_no_cas_number_is_refused(cas):
    with pytest.raises(BadInput):
        engine_curve(cas, "density")


def test_a_wrong_check_digit_is_refused_and_the_right_one_named():
    with pytest.raises(BadInput, match="110-82-7"):
        engine_curve("110-82-6", "density")


@given(st.integers(10, 9_999_999), st.integers(0, 99))
def test_one_last_digit_of_ten_is_accepted(first, second):
    accepted = 0
    for last in range(10):
        try:
            check_cas(f"{first}-{second:02d}-{last}")
        except BadInput:
            continue
        accepted += 1
    assert accepted == 1


@given(st.text())
def test_arbitrary_text_raises_only_bad_input(text):
    with contextlib.suppress(BadInput):
        assert check_cas(text) == text


@given(
    st.sampled_from(["110-82-7", "67-66-3", "x"]), st.text() | st.none(), st.text() | st.integers()
)
def test_arbitrary_properties_and_methods_raise_only_dropkits_errors(cas, prop, method):
    with pytest.raises(DropkitError):
        engine_curve(cas, prop)
    with pytest.raises(DropkitError):
        engine_curve(cas, "viscosity", method=method)


def test_unknown_property_and_unknown_chemical():
    with pytest.raises(UnknownName, match="viscosity"):
        engine_curve("110-82-7", "viscosty")
    # A number with a right check digit that no engine knows.
    with pytest.raises(MissingProperty, match="no whitelisted method"):
        engine_curve("999999-99-4", "density")
    assert engine_properties("999999-99-4") == ()
    assert engine_curves("999999-99-4", "density") == ()


# ------------------------------------------------ values of liquids that dropkit has no record of
VALUES = [
    ("110-82-7", "density", 298.15, 773.844, "ThermoML 10.1016/j.tca.2012.04.002"),
    ("110-82-7", "density", 323.15, 749.887, "ThermoML 10.1016/j.tca.2012.04.002"),
    ("110-82-7", "viscosity", 298.15, 0.8945e-3, "ThermoML 10.1021/je049661s"),
    ("110-82-7", "surface_tension", 293.15, 25.24e-3, "Jasper 1972, line in Lange's Handbook"),
    ("110-82-7", "vapour_pressure", 360.0, 121310.0, "VDI Heat Atlas 2010, saturation table"),
    ("110-54-3", "density", 298.15, 654.89, "ThermoML 10.1021/je060355j"),
    ("110-54-3", "viscosity", 298.15, 0.2974e-3, "ThermoML 10.1016/j.jct.2004.09.021"),
    ("110-54-3", "viscosity", 325.0, 0.2352e-3, "VDI Heat Atlas 2010, saturation table"),
    ("110-54-3", "surface_tension", 298.15, 17.89e-3, "Jasper 1972, line in Lange's Handbook"),
    ("110-54-3", "vapour_pressure", 300.0, 21870.0, "VDI Heat Atlas 2010, saturation table"),
    ("67-66-3", "density", 298.15, 1478.82, "ThermoML 10.1016/j.jct.2006.03.010"),
    ("67-66-3", "density", 323.15, 1429.89, "ThermoML 10.1016/j.tca.2014.05.004"),
    ("67-66-3", "surface_tension", 298.15, 26.67e-3, "Jasper 1972, line in Lange's Handbook"),
    ("71-43-2", "density", 323.15, 846.65, "ThermoML 10.1016/j.tca.2012.08.011"),
    ("71-43-2", "viscosity", 298.15, 0.603e-3, "ThermoML 10.1007/s10765-013-1526-8"),
    ("71-43-2", "surface_tension", 298.15, 28.57e-3, "ThermoML Thermochim. Acta 439 (2005) 1-7"),
    ("71-43-2", "speed_of_sound", 298.15, 1299.2, "ThermoML Thermochim. Acta 439 (2005) 1-7"),
    ("124-18-5", "density", 298.15, 726.31, "ThermoML 10.1016/j.tca.2004.12.026"),
    ("124-18-5", "viscosity", 298.15, 0.852e-3, "ThermoML 10.1016/j.jct.2007.05.016"),
    ("100-41-4", "density", 313.15, 849.3, "ThermoML 10.1016/j.jct.2008.07.009"),
    ("100-41-4", "viscosity", 313.15, 0.5294e-3, "ThermoML 10.1007/s10765-009-0667-2"),
    ("109-99-9", "density", 323.15, 854.8, "ThermoML 10.1016/j.tca.2011.07.005"),
    ("109-99-9", "viscosity", 298.15, 0.4631e-3, "ThermoML 10.1021/je0600653"),
    ("71-36-3", "density", 333.15, 778.056, "ThermoML 10.1007/s10765-013-1469-0"),
    ("71-36-3", "viscosity", 333.15, 1.1316e-3, "ThermoML 10.1007/s10765-013-1469-0"),
    ("123-91-1", "density", 313.15, 1011.24, "ThermoML 10.1021/je5010643"),
    ("123-91-1", "viscosity", 298.15, 1.1948e-3, "ThermoML 10.1016/j.jct.2017.01.016"),
    ("78-83-1", "viscosity", 298.15, 3.334e-3, "ThermoML 10.1016/j.fluid.2005.05.012"),
    ("64-19-7", "viscosity", 298.15, 1.115e-3, "ThermoML 10.1016/j.fluid.2005.07.010"),
    ("68-12-2", "viscosity", 298.15, 0.808e-3, "ThermoML 10.1021/je700430g"),
    ("431-89-0", "surface_tension", 293.15, 7.46e-3, "Int. J. Thermophys. 27 (2006) 1609-1625"),
    ("142-96-1", "static_permittivity", 298.15, 3.106, "ThermoML 10.1016/j.tca.2012.05.036"),
]


@pytest.mark.parametrize(("cas", "prop", "temperature", "value", "source"), VALUES)
def test_published_values_lie_within_the_stated_uncertainty(cas, prop, temperature, value, source):
    curve = engine_curve(cas, prop)
    band = 2.0 * curve.uncertainty  # 95 %
    assert curve.scalar(temperature) == pytest.approx(value, rel=band), (curve.method, source)
    assert curve.grade in ("single", "estimated")
    assert set(curve.sources) == {records.source(key).key for key in curve.sources}


def test_a_curve_says_where_it_comes_from():
    curve = engine_curve("67-66-3", "viscosity")
    assert (curve.engine, curve.method, curve.grade) == ("thermo", "DIPPR_PERRY_8E", "single")
    assert curve.version.startswith("0.")
    assert "chemicals" in curve.version
    assert (curve.range.low, curve.range.high) == (209.63, 353.2)  # as its table states
    use = curve.record_use()
    assert use.record == "thermo: DIPPR_PERRY_8E of 67-66-3"
    assert (use.sources, use.place) == (("PerryGreen2008",), "table 2-313")
    assert use.grade == "single"
    density = engine_curve("110-82-7", "density")
    assert (density.engine, density.method) == ("CoolProp", "HEOS")
    assert density.sources == ("Bell2014",)
    assert "Zhou-JPCRD-2014" in density.place  # CoolProp's own key of the paper


def test_no_grade_is_better_than_single():
    assert {c.grade for prop in PROPERTIES for c in engine_curves("110-82-7", prop)} == {"single"}


# ------------------------------------------------ bodies
SAMPLES = ("110-82-7", "67-66-3", "71-36-3", "109-66-0", "64-19-7", "107-21-1")


def every_curve() -> list[EngineCurve]:
    return [c for cas in SAMPLES for prop in PROPERTIES for c in engine_curves(cas, prop)]


def test_arrays_equal_scalars():
    assert {c.method for c in every_curve()} > {"HEOS", "VDI_PPDS", "REFPROP", "JASPER", "CRC"}
    for curve in every_curve():
        temperature = np.linspace(curve.range.low, curve.range.high, 13)
        out = np.empty_like(temperature)
        curve.fill(temperature, out)
        scalars = np.array([curve.scalar(float(t)) for t in temperature])
        # 4 ulp for the forms; powers and exponentials of large arguments multiply them.
        np.testing.assert_allclose(out, scalars, rtol=1e-13, err_msg=repr(curve))
        strided = np.repeat(temperature, 2)[::2]
        again = np.empty(26)[::2]
        curve.fill(strided, again)
        assert np.array_equal(again, out)
        fast = curve.fast
        assert (fast.low, fast.high) == (curve.range.low, curve.range.high)
        assert fast.value(fast.low) == scalars[0]


def test_every_row_of_every_table_is_positive_finite_and_falls_where_it_must():
    # Which of them have data to rise: acids, whose vapour is partly dimers, and hydrogen fluoride.
    dimers = {"64-18-6", "64-19-7", "79-09-4", "79-10-7", "79-31-2", "7664-39-3"}
    helium = "7440-59-7"
    count = 0
    for method in METHODS:
        for cas in tables._table(method.table):
            curve = handbook_curve(cas, method)
            if curve is None:
                continue
            count += 1
            temperature = np.linspace(curve.range.low, curve.range.high, 21)
            out = np.empty_like(temperature)
            curve.fill(temperature, out)
            assert np.isfinite(out).all(), (cas, method.method, method.quantity)
            rises = np.diff(out) > 0.0
            if method.quantity == "vapour_pressure":
                assert rises.all(), (cas, method.method)
            elif method.quantity in ("density", "viscosity", "surface_tension"):
                assert cas == helium or not rises.any(), (cas, method.method, method.quantity)
            elif method.quantity == "heat_of_vaporisation":
                assert cas in dimers or not rises.any(), (cas, method.method)
    assert count > 4000


def test_equations_are_those_that_thermo_evaluates():
    from thermo.interface import SurfaceTension
    from thermo.permittivity import PermittivityLiquid
    from thermo.phase_change import EnthalpyVaporization
    from thermo.thermal_conductivity import ThermalConductivityLiquid
    from thermo.vapor_pressure import VaporPressure
    from thermo.viscosity import ViscosityLiquid
    from thermo.volume import VolumeLiquid

    engines = {
        "density": VolumeLiquid,
        "viscosity": ViscosityLiquid,
        "surface_tension": SurfaceTension,
        "vapour_pressure": VaporPressure,
        "heat_of_vaporisation": EnthalpyVaporization,
        "thermal_conductivity": ThermalConductivityLiquid,
        "static_permittivity": PermittivityLiquid,
    }
    compared = set()
    for cas in ("110-82-7", "67-66-3", "107-21-1"):
        mass = tables.molar_mass_of(cas)
        for (prop, name), method in METHOD.items():
            curve = handbook_curve(cas, method)
            if prop not in engines or curve is None:
                continue
            thermo = engines[prop](CASRN=cas)
            for part in (0.1, 0.5, 0.9):
                t = curve.range.low + part * (curve.range.high - curve.range.low)
                value = thermo.calculate(t, name)
                if prop == "density":
                    value = mass / value
                elif prop == "heat_of_vaporisation":
                    value /= mass
                # Densities of the VDI pass through its molar mass, printed to 0.01 g/mol.
                assert curve.bodies[0](t) == pytest.approx(value, rel=1e-9), (cas, prop, name)
            compared.add((prop, name))
    assert compared == {key for key in METHOD if key[0] in engines}


def test_heat_capacity_of_perry_against_coolprop():
    # Not among thermo's named methods; two independent sources.
    perry = engine_curve("110-82-7", "heat_capacity", method="DIPPR_PERRY_8E")
    heos = engine_curve("110-82-7", "heat_capacity")
    for t in (290.0, 330.0, 380.0):
        band = 2 * math.hypot(perry.uncertainty, heos.uncertainty)
        assert perry.scalar(t) == pytest.approx(heos.scalar(t), rel=band)


def test_pickles_are_read_where_nothing_was_imported(tmp_path):
    curves = [engine_curve("67-66-3", "viscosity"), engine_curve("107-21-1", "viscosity")]
    assert pickle.loads(pickle.dumps(curves)) == curves
    contradicted = engine_curves("106-44-5", "viscosity")
    assert pickle.loads(pickle.dumps(contradicted)) == contradicted
    path = tmp_path / "curves.pickle"
    path.write_bytes(pickle.dumps(curves))
    code = (
        f"import pickle; print([c.scalar(300.0) for c in pickle.load(open({str(path)!r}, 'rb'))])"
    )
    run = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True, check=False)
    assert run.stdout.strip() == repr([c.scalar(300.0) for c in curves]), run.stderr


# ------------------------------------------------ engines of another version, or broken
def test_a_table_with_other_columns_or_none_is_refused(monkeypatch):
    key = "perry viscosity"
    known = tables.TABLES[key]
    tables._table.cache_clear()
    monkeypatch.setitem(tables.TABLES, key, known._replace(columns=("CAS", "other")))
    with pytest.raises(EngineError, match="other columns"):
        engine_curve("67-66-3", "viscosity")
    monkeypatch.setitem(tables.TABLES, key, known._replace(file="missing.tsv"))
    with pytest.raises(EngineError, match="cannot be read"):
        engine_curve("67-66-3", "viscosity")
    monkeypatch.undo()
    tables._table.cache_clear()
    assert engine_curve("67-66-3", "viscosity").method == "DIPPR_PERRY_8E"


def test_failures_inside_the_range_are_the_librarys_own_errors():
    from dataclasses import replace

    def fail(temperature: float) -> float:
        raise ValueError("no solution")

    def negative(temperature: np.ndarray, out: np.ndarray) -> None:
        out[...] = -1.0

    curve = engine_curve("67-66-3", "viscosity")
    broken = replace(curve, bodies=(fail, negative))
    with pytest.raises(EngineError, match="no solution"):
        broken.scalar(300.0)
    out = np.empty(2)
    broken.fill(np.array([300.0, 310.0]), out)
    assert np.isnan(out).all()
    with pytest.raises(EngineError, match="came out"):
        replace(curve, bodies=(lambda t: -1.0, negative)).scalar(300.0)
