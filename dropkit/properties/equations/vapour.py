"""Vapour pressure, and the general logarithmic form that handbooks use for it."""

from __future__ import annotations

from math import exp, log
from math import pow as power_of

import numpy as np

from dropkit.properties.equations.critical import pair_up, sum_of_powers, sum_of_powers_into
from dropkit.properties.equations.form import (
    ArrayBody,
    FloatArray,
    Form,
    Parameter,
    ScalarBody,
    scale_by,
)

__all__ = ["ANTOINE", "DIPPR101", "WAGNER"]


def _antoine(coefficients: tuple[float, ...], unit: float) -> tuple[ScalarBody, ArrayBody]:
    a, b, c = coefficients

    def scalar(T: float) -> float:
        return power_of(10.0, a - b / (T + c)) * unit

    def array(T: FloatArray, out: FloatArray) -> None:
        np.add(T, c, out=out)
        np.divide(b, out, out=out)
        np.subtract(a, out, out=out)
        np.power(10.0, out, out=out)
        scale_by(out, unit)

    return scalar, array


def _dippr101(coefficients: tuple[float, ...], unit: float) -> tuple[ScalarBody, ArrayBody]:
    a, b, c, d, e = coefficients

    def scalar(T: float) -> float:
        return exp(a + b / T + c * log(T) + d * power_of(T, e)) * unit

    def array(T: FloatArray, out: FloatArray) -> None:
        np.divide(b, T, out=out)
        np.add(out, a, out=out)
        term = np.log(T)
        np.multiply(term, c, out=term)
        np.add(out, term, out=out)
        if d != 0.0:
            np.power(T, e, out=term)
            np.multiply(term, d, out=term)
            np.add(out, term, out=out)
        np.exp(out, out=out)
        scale_by(out, unit)

    return scalar, array


def _wagner(
    coefficients: tuple[float, ...],
    exponents: tuple[float, ...],
    critical_temperature: float,
    critical_pressure: float,
    unit: float,
) -> tuple[ScalarBody, ArrayBody]:
    terms = pair_up(coefficients, exponents)
    series = sum_of_powers(terms)
    whole = critical_pressure * unit

    def scalar(T: float) -> float:
        return whole * exp(series(1.0 - T / critical_temperature) * critical_temperature / T)

    def array(T: FloatArray, out: FloatArray) -> None:
        tau = np.divide(T, critical_temperature)
        np.subtract(1.0, tau, out=tau)
        sum_of_powers_into(terms, tau, out)
        np.multiply(out, critical_temperature, out=out)
        np.divide(out, T, out=out)
        np.exp(out, out=out)
        np.multiply(out, whole, out=out)

    return scalar, array


ANTOINE = Form(
    "antoine",
    "10^(A - B/(T + C)) in the stated unit, coefficients [A, B, C]",
    (Parameter("coefficients", "numbers", size=(3, 3)),),
    _antoine,
)
DIPPR101 = Form(
    "dippr101",
    "exp(A + B/T + C ln T + D T^E), coefficients [A, B, C, D, E]",
    (Parameter("coefficients", "numbers", size=(5, 5)),),
    _dippr101,
)
WAGNER = Form(
    "wagner",
    "critical_pressure * exp(critical_temperature/T * sum a_i (1 - T/critical_temperature)^n_i)",
    (
        Parameter("coefficients", "numbers"),
        Parameter("exponents", "numbers"),
        Parameter("critical_temperature", "positive"),
        Parameter("critical_pressure", "positive"),
    ),
    _wagner,
)
