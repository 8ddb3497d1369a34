"""Equation forms: published values, scalar against array body, bad parameters, chunks."""

from __future__ import annotations

import math
import threading
from collections.abc import Mapping
from pathlib import Path
from typing import Any

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import RecordError
from dropkit.properties.equations import FORMS, Form, evaluate
from dropkit.properties.equations.critical import sum_of_powers
from dropkit.properties.equations.polynomials import horner

WATER_TC = 647.096

# form, parameters, temperature, value, relative tolerance, where the value comes from
PUBLISHED: list[tuple[str, dict[str, Any], float, float, float, str]] = [
    (
        "critical_powers",
        {
            "coefficients": [1.0, -0.625],
            "exponents": [1.256, 2.256],
            "critical_temperature": WATER_TC,
            "factor": 235.8,
            "unit": 0.001,
        },
        298.15,
        0.07197,
        1e-4,
        "IAPWS R1-76(2014) for water, computed with an independent library",
    ),
    (
        "critical_powers",
        {
            "coefficients": [
                *(1.0, 1.99274064, 1.09965342, -0.510839303),
                *(-1.75493479, -45.5170352, -6.74694450e5),
            ],
            "exponents": [0.0, 1 / 3, 2 / 3, 5 / 3, 16 / 3, 43 / 3, 110 / 3],
            "critical_temperature": WATER_TC,
            "factor": 322.0,
        },
        298.15,
        997.0476,
        1e-4,
        "coefficients of IAPWS SR1-86(1992) from memory; density by IAPWS R6-95",
    ),
    (
        "wagner",
        {
            "coefficients": [
                *(-7.85951783, 1.84408259, -11.7866497),
                *(22.6807411, -15.9618719, 1.80122502),
            ],
            "exponents": [1.0, 1.5, 3.0, 3.5, 4.0, 7.5],
            "critical_temperature": WATER_TC,
            "critical_pressure": 22.064e6,
        },
        298.15,
        3169.93,
        2e-4,
        "coefficients of IAPWS SR1-86(1992) from memory; vapour pressure by IAPWS R6-95",
    ),
    (
        "antoine",
        {"coefficients": [8.07131, 1730.63, 233.426 - 273.15], "unit": 133.322368},
        373.15,
        101325.0,
        1e-3,
        "textbook constants in mmHg from memory; water boils at 100 degC",
    ),
    (
        "dippr101",
        {"coefficients": [73.649, -7258.2, -7.3037, 4.1653e-6, 2.0]},
        298.15,
        3169.93,
        5e-3,
        "handbook constants from memory; vapour pressure by IAPWS R6-95",
    ),
    (
        "powers",
        {
            "coefficients": [280.68, 511.45, 61.131, 0.45903],
            "exponents": [-1.9, -7.7, -19.6, -40.0],
            "reference_temperature": 300.0,
            "unit": 1e-6,
        },
        323.15,
        0.0005465,
        2e-4,
        "coefficients of IAPWS SR6-08 from memory; viscosity by IAPWS R12-08",
    ),
    (
        "rational",
        {
            "numerator": [
                *(999.83952, 16.952577, -7.9905127e-3),
                *(-46.241757e-6, 105.84601e-9, -281.03006e-12),
            ],
            "denominator": [1.0, 16.887236e-3],
            "centre": 273.15,
        },
        323.15,
        988.0350,
        2e-5,
        "Kell's equation as the sugar manual prints it; density by IAPWS R6-95",
    ),
    (
        "polynomial",
        {"coefficients": [0.0309, -0.0001189], "centre": 273.15},
        293.15,
        0.02852,
        2e-4,
        "Jasper 1972, toluene, both as reprinted in Lange's Handbook",
    ),
    (
        "rackett",
        {"coefficients": [1.2332, 0.25886, 508.2, 0.2913], "unit": 58.0791},
        298.15,
        784.5,
        3e-3,
        "handbook constants of acetone from memory; density from the CRC Handbook, 95th ed.",
    ),
    (
        "watson",
        {
            "coefficients": [5.2053e7, 0.3199, -0.212, 0.25795],
            "critical_temperature": WATER_TC,
            "unit": 1 / 18.015268,
        },
        373.15,
        2.2565e6,
        5e-3,
        "handbook constants of water from memory; steam tables, 2256.5 kJ/kg, from memory",
    ),
    (
        "power",
        {"A": 1.2e-5, "n": 1.75, "reference_temperature": 298.15},
        4 * 298.15,
        1.2e-5 * 2**3.5,
        1e-14,
        "by hand: 4^1.75 = 2^3.5",
    ),
    (
        "guggenheim",
        {"s0": 0.064, "n": 1.5, "critical_temperature": 400.0},
        300.0,
        0.008,
        1e-14,
        "by hand: (1 - 3/4)^1.5 = 1/8",
    ),
    (
        "vogel",
        {"coefficients": [math.log(2.0), 100.0 * math.log(2.0), 200.0]},
        250.0,
        8.0,
        1e-14,
        "by hand: 2 * 2^(100/50)",
    ),
    (
        "exp_polynomial",
        {
            "coefficients": [0.0, math.log(10.0)],
            "variable": "1/T",
            "scale": 600.0,
            "centre": 1.0,
        },
        300.0,
        10.0,
        1e-14,
        "by hand: z = 600/300 - 1 = 1",
    ),
    (
        "exp_polynomial",
        {"coefficients": [1.0, 1.0, 1.0], "centre": 300.0, "scale": 10.0},
        320.0,
        math.exp(7.0),
        1e-14,
        "by hand: z = 2",
    ),
    ("constant", {"value": 81.0, "unit": 2.0}, 300.0, 162.0, 0.0, "by hand"),
]


@pytest.mark.parametrize(
    ("name", "parameters", "T", "value", "tolerance", "origin"),
    PUBLISHED,
    ids=[f"{row[0]}-{number}" for number, row in enumerate(PUBLISHED)],
)
def test_gives_the_published_value(
    name: str, parameters: dict[str, Any], T: float, value: float, tolerance: float, origin: str
) -> None:
    form = FORMS[name]
    assert form.scalar(parameters)(T) == pytest.approx(value, rel=tolerance, abs=0.0), origin
    array = evaluate(form.array(parameters), np.array([T, T]))
    assert array == pytest.approx([value, value], rel=tolerance, abs=0.0), origin


def test_every_form_is_checked_against_a_value() -> None:
    assert {row[0] for row in PUBLISHED} == set(FORMS)


# Scalar against array body ----------------------------------------------------------------

small = st.floats(-3.0, 3.0)
coefficient_lists = st.lists(st.floats(-1e3, 1e3), min_size=1, max_size=9)
exponents = st.floats(-2.0, 9.0)


@st.composite
def power_terms(draw: st.DrawFn) -> tuple[list[float], list[float]]:
    count = draw(st.integers(1, 6))
    lists = st.lists(st.floats(-50.0, 50.0), min_size=count, max_size=count)
    steps = st.lists(st.integers(0, 5), min_size=count, max_size=count)
    if draw(st.booleans()):  # exponents whole steps apart take a path of their own
        lowest = draw(st.floats(0.2, 2.0))
        return draw(lists), [lowest + step for step in draw(steps)]
    return draw(lists), draw(st.lists(exponents, min_size=count, max_size=count))


@st.composite
def cases(draw: st.DrawFn) -> tuple[str, dict[str, Any]]:
    name = draw(st.sampled_from(sorted(FORMS)))
    centre_scale = {"centre": draw(st.floats(0.0, 400.0)), "scale": draw(st.floats(0.5, 400.0))}
    if draw(st.booleans()):
        centre_scale = {}
    coefficients, powers = draw(power_terms())
    high_critical = {"critical_temperature": draw(st.floats(700.0, 2000.0))}
    parameters: dict[str, Any] = {
        "constant": {"value": draw(st.floats(-1e6, 1e6))},
        "polynomial": {"coefficients": draw(coefficient_lists), **centre_scale},
        "rational": {
            "numerator": draw(coefficient_lists),
            "denominator": draw(coefficient_lists),
            **centre_scale,
        },
        "exp_polynomial": {
            "coefficients": draw(st.lists(small, min_size=1, max_size=8)),
            "centre": 1.0 if draw(st.booleans()) else 300.0,
            "scale": 200.0,
            "variable": "T",
        },
        "vogel": {
            "coefficients": [
                draw(small),
                draw(st.floats(-900.0, 2e3)),
                draw(st.floats(-50.0, 200.0)),
            ]
        },
        "critical_powers": {"coefficients": coefficients, "exponents": powers, **high_critical},
        "guggenheim": {"s0": draw(st.floats(0.01, 1.0)), "n": draw(exponents), **high_critical},
        "power": {
            "A": draw(st.floats(0.01, 1.0)),
            "n": draw(exponents),
            "reference_temperature": 298.15,
        },
        "powers": {
            "coefficients": coefficients,
            "exponents": powers,
            "reference_temperature": 300.0,
        },
        "rackett": {
            "coefficients": [
                draw(st.floats(0.1, 20.0)),
                draw(st.floats(0.2, 0.4)),
                draw(st.floats(700.0, 2000.0)),
                draw(st.floats(0.2, 0.4)),
            ]
        },
        "watson": {
            "coefficients": [
                draw(st.floats(1e3, 1e8)),
                *draw(st.lists(st.floats(0.0, 1.0), min_size=1, max_size=4)),
            ],
            **high_critical,
        },
        "antoine": {
            "coefficients": [
                draw(st.floats(5.0, 12.0)),
                draw(st.floats(500.0, 3e3)),
                draw(st.floats(-100.0, 0.0)),
            ]
        },
        "dippr101": {
            "coefficients": [
                draw(st.floats(-60.0, 100.0)),
                draw(st.floats(-9e3, 5e3)),
                draw(st.floats(-9.0, 9.0)),
                draw(st.sampled_from([0.0, 4e-6, -1e-17])),
                draw(st.sampled_from([2.0, 6.0])),
            ]
        },
        "wagner": {
            "coefficients": coefficients,
            "exponents": [abs(n) + 1.0 for n in powers],
            "critical_pressure": draw(st.floats(1e6, 3e7)),
            **high_critical,
        },
    }[name]
    if draw(st.booleans()):
        parameters["unit"] = draw(st.sampled_from([1e-3, 133.322368, 2.0]))
    return name, parameters


def conditioning(name: str, p: Mapping[str, Any], T: float, value: float) -> float:
    """How many units in the last place one such unit in a power or logarithm can cost.

    The bodies do the same arithmetic in the same order: only `exp`, `log` and `pow` may differ,
    by a unit or two, between the mathematical library and numpy. Where such a result is
    a term of a sum that cancels, or stands in an exponent, its error grows by this factor.
    """
    unit = p.get("unit", 1.0)
    if name in ("critical_powers", "powers"):
        scale = p.get("critical_temperature", p.get("reference_temperature"))
        x = 1.0 - T / scale if name == "critical_powers" else T / scale
        terms = [s * x**n for s, n in zip(p["coefficients"], p["exponents"], strict=True)]
        return sum(map(abs, terms)) * unit / abs(value)
    if name == "wagner":
        ratio = p["critical_temperature"] / T
        x = 1.0 - 1.0 / ratio
        terms = [s * x**n for s, n in zip(p["coefficients"], p["exponents"], strict=True)]
        return 1.0 + ratio * sum(map(abs, terms))
    if name == "dippr101":
        _, _, c, d, e = p["coefficients"]
        return 1.0 + abs(c * math.log(T)) + abs(d * T**e)
    return 1.0


@given(cases(), st.lists(st.floats(220.0, 690.0), min_size=1, max_size=12))
def test_array_body_equals_scalar_body_to_4_ulp(
    case: tuple[str, dict[str, Any]], temperatures: list[float]
) -> None:
    name, parameters = case
    scalar = FORMS[name].scalar(parameters)
    T = np.array(temperatures)
    with np.errstate(all="ignore"):
        found = evaluate(FORMS[name].array(parameters), T)
    for t, y in zip(temperatures, found.tolist(), strict=True):
        try:
            expected = scalar(t)
        except (ArithmeticError, ValueError):
            # Where the equation has no value, or none that fits a float.
            assert not math.isfinite(y)
            continue
        if not math.isfinite(expected):
            assert not math.isfinite(y)
            continue
        if abs(expected) < 1e-290 or abs(y) < 1e-290:
            # Next to the smallest float there are no four digits left to compare.
            assert abs(expected - y) < 1e-290
            continue
        allowed = 4.0 * conditioning(name, parameters, t, expected)
        assert abs(y - expected) <= allowed * math.ulp(expected), (t, expected, y)


@given(st.lists(st.floats(-10, 10), min_size=1, max_size=12), st.floats(-3, 3))
def test_horner_is_the_sum_of_powers(coefficients: list[float], z: float) -> None:
    exact = math.fsum(c * z**i for i, c in enumerate(coefficients))
    size = math.fsum(abs(c) * abs(z) ** i for i, c in enumerate(coefficients))
    assert horner(tuple(coefficients))(z) == pytest.approx(exact, abs=1e-14 * size + 1e-300)


@given(power_terms(), st.floats(0.01, 3.0))
def test_sum_of_powers_is_the_sum(terms: tuple[list[float], list[float]], x: float) -> None:
    pairs = tuple(zip(*terms, strict=True))
    exact = math.fsum(s * x**n for s, n in pairs)
    size = math.fsum(abs(s * x**n) for s, n in pairs)
    assert sum_of_powers(pairs)(x) == pytest.approx(exact, abs=1e-13 * size + 1e-300)


@given(cases(), st.floats(220.0, 690.0), st.sampled_from([1e-3, 1.0, 133.322368]))
def test_the_unit_is_a_plain_factor(
    case: tuple[str, dict[str, Any]], T: float, unit: float
) -> None:
    name, parameters = case
    bare = {key: value for key, value in parameters.items() if key != "unit"}
    try:
        one, scaled = (FORMS[name].scalar(p)(T) for p in (bare, {**bare, "unit": unit}))
    except (ArithmeticError, ValueError):
        return
    if 1e-290 < abs(one) < 1e290:
        assert scaled == pytest.approx(one * unit, rel=1e-13, abs=0.0)


def test_beyond_the_critical_point_there_is_no_value() -> None:
    parameters = {"s0": 0.06, "n": 1.2, "critical_temperature": 500.0}
    with pytest.raises(ValueError, match="math domain error"):
        FORMS["guggenheim"].scalar(parameters)(510.0)
    with np.errstate(invalid="ignore"):
        found = evaluate(FORMS["guggenheim"].array(parameters), np.array([490.0, 500.0, 510.0]))
    assert found[0] > 0
    assert found[1] == 0
    assert np.isnan(found[2])


@pytest.mark.parametrize("row", PUBLISHED, ids=lambda row: row[0])
def test_nan_in_nan_out(row: tuple[Any, ...]) -> None:
    found = evaluate(FORMS[row[0]].array(row[1]), np.array([np.nan, row[2]]))
    assert np.isnan(found[0])
    assert np.isfinite(found[1])
    assert math.isnan(FORMS[row[0]].scalar(row[1])(math.nan))


# Bad parameters ---------------------------------------------------------------------------

VOGEL = {"coefficients": [-4.0, 500.0, 150.0]}


@pytest.mark.parametrize(
    ("name", "parameters", "message"),
    [
        ("vogel", {}, r"form 'vogel' needs the parameter 'coefficients'"),
        ("vogel", {"coefficients": [1.0, 2.0]}, r"must hold 3 numbers, not 2"),
        ("vogel", {"coefficients": 3.0}, r"must be a list of numbers"),
        ("vogel", {"coefficients": [1.0, "2", 3.0]}, r"must be a number, not '2'"),
        ("vogel", {"coefficients": [1.0, True, 3.0]}, r"must be a number, not True"),
        ("vogel", {"coefficients": [1.0, math.nan, 3.0]}, r"must be finite"),
        ("vogel", {**VOGEL, "unit": 0.0}, r"'unit' of form 'vogel' must be above zero"),
        ("vogel", {"coeficients": [1.0, 2.0, 3.0]}, r"Did you mean 'coefficients'\?"),
        ("vogel", {**VOGEL, "centre": 1.0}, r"takes no parameter 'centre'"),
        ("polynomial", {"coefficients": []}, r"must hold 1 to 64 numbers, not 0"),
        ("polynomial", {"coefficients": [1.0], "scale": -1.0}, r"must be above zero, not -1"),
        (
            "exp_polynomial",
            {"coefficients": [1.0], "variable": "lnT"},
            r"must be 'T' or '1/T', not 'lnT'",
        ),
        (
            "critical_powers",
            {"coefficients": [1.0, 2.0], "exponents": [1.0], "critical_temperature": 600.0},
            r"has 2 coefficients but 1 exponents",
        ),
        ("guggenheim", {"s0": 0.06, "n": 1.2}, r"needs the parameter 'critical_temperature'"),
    ],
)
def test_wrong_parameters_are_named(name: str, parameters: dict[str, Any], message: str) -> None:
    with pytest.raises(RecordError, match=message):
        FORMS[name].scalar(parameters)
    with pytest.raises(RecordError, match=r"^liquids/x: viscosity 1: "):
        FORMS[name].array(parameters, label="liquids/x: viscosity 1")


def test_unknown_form_names_the_nearest() -> None:
    with pytest.raises(RecordError, match=r"'vogle' is not known.*Did you mean 'vogel'\?"):
        FORMS["vogle"]
    assert "vogle" not in FORMS
    assert "vogel" in FORMS


def test_forms_know_their_names_and_the_format_page_lists_them() -> None:
    page = (Path(__file__).parents[2] / "data" / "README.md").read_text(encoding="utf-8")
    assert len(FORMS) == len(list(FORMS))
    for name, form in FORMS.items():
        assert isinstance(form, Form)
        assert form.name == name
        row = next(line for line in page.splitlines() if line.startswith(f"| `{name}` |"))
        for parameter in form.parameters:
            assert parameter.name in row.rsplit("|", 2)[1], f"{name}: {parameter.name}"


# Chunks -----------------------------------------------------------------------------------


@given(
    st.integers(0, 70),
    st.integers(1, 20),
    st.sampled_from(["polynomial", "vogel", "rational", "critical_powers"]),
)
def test_chunks_do_not_change_the_result(size: int, chunk: int, name: str) -> None:
    parameters = next(row[1] for row in PUBLISHED if row[0] == name)
    body = FORMS[name].array(parameters)
    T = np.linspace(280.0, 400.0, size)
    assert np.array_equal(evaluate(body, T, chunk=chunk), evaluate(body, T))


@pytest.mark.parametrize("shape", [(), (0,), (1,), (3, 4), (2, 3, 4)])
def test_keeps_the_shape(shape: tuple[int, ...]) -> None:
    body, scalar = FORMS["vogel"].array(VOGEL), FORMS["vogel"].scalar(VOGEL)
    T = np.full(shape, 300.0)
    found = evaluate(body, T)
    assert found.shape == shape
    assert np.all(found == scalar(300.0))


def test_strided_input_and_output() -> None:
    body = FORMS["vogel"].array(VOGEL)
    T = np.linspace(280.0, 400.0, 24).reshape(4, 6)
    expected = evaluate(body, T.copy())
    assert np.array_equal(evaluate(body, T.T), expected.T)
    assert np.array_equal(evaluate(body, T[:, ::2]), expected[:, ::2])
    out = np.zeros((6, 8))
    returned = evaluate(body, T.T, out=out[:, ::2])
    assert np.shares_memory(returned, out)
    assert np.array_equal(out[:, ::2], expected.T)
    assert not out[:, 1::2].any()


def test_input_is_left_alone_unless_it_is_the_output() -> None:
    body = FORMS["polynomial"].array({"coefficients": [1.0, 2.0, 3.0], "centre": 300.0})
    T = np.linspace(280.0, 400.0, 11)
    before = T.copy()
    expected = evaluate(body, T)
    assert np.array_equal(T, before)
    assert evaluate(body, T, out=T) is T
    assert np.array_equal(T, expected)
    with pytest.raises(ValueError, match="out has shape"):
        evaluate(body, T, out=np.empty(5))


def test_one_body_serves_many_threads() -> None:
    parameters = next(row[1] for row in PUBLISHED if row[0] == "wagner")
    body = FORMS["wagner"].array(parameters)
    inputs = [np.linspace(280.0 + i, 600.0, 40_000) for i in range(8)]
    expected = [evaluate(body, T) for T in inputs]
    found: dict[int, Any] = {}
    threads = [
        threading.Thread(target=lambda i=i: found.update({i: evaluate(body, inputs[i])}))
        for i in range(8)
    ]
    for thread in threads:
        thread.start()
    for thread in threads:
        thread.join()
    for i, values in enumerate(expected):
        assert np.array_equal(found[i], values)
