"""Exponentials of temperature: viscosity above all."""

from __future__ import annotations

from math import exp

import numpy as np

from dropkit.properties.equations.form import (
    ArrayBody,
    FloatArray,
    Form,
    Parameter,
    ScalarBody,
    scale_by,
)
from dropkit.properties.equations.polynomials import horner, horner_into, series_in

__all__ = ["EXP_POLYNOMIAL", "VOGEL"]


def _vogel(coefficients: tuple[float, ...], unit: float) -> tuple[ScalarBody, ArrayBody]:
    a, b, c = coefficients

    def scalar(T: float) -> float:
        return exp(a + b / (T - c)) * unit

    def array(T: FloatArray, out: FloatArray) -> None:
        np.subtract(T, c, out=out)
        np.divide(b, out, out=out)
        np.add(out, a, out=out)
        np.exp(out, out=out)
        scale_by(out, unit)

    return scalar, array


def _exp_polynomial(
    coefficients: tuple[float, ...], variable: str, centre: float, scale: float, unit: float
) -> tuple[ScalarBody, ArrayBody]:
    series = horner(coefficients)
    direct = series_in(coefficients, centre, scale)
    inverse = variable == "1/T"

    def scalar(T: float) -> float:
        return exp(direct(T)) * unit

    def scalar_of_inverse(T: float) -> float:
        return exp(series(scale / T - centre)) * unit

    def array(T: FloatArray, out: FloatArray) -> None:
        if inverse:
            z = np.divide(scale, T)
            np.subtract(z, centre, out=z)
        else:
            z = np.subtract(T, centre)
            np.divide(z, scale, out=z)
        horner_into(coefficients, z, out)
        np.exp(out, out=out)
        scale_by(out, unit)

    return (scalar_of_inverse if inverse else scalar), array


VOGEL = Form(
    "vogel",
    "exp(A + B/(T - C)), coefficients [A, B, C]",
    (Parameter("coefficients", "numbers", size=(3, 3)),),
    _vogel,
)
EXP_POLYNOMIAL = Form(
    "exp_polynomial",
    "exp(sum c_i z^i), z = (T - centre)/scale, or scale/T - centre for variable '1/T'",
    (
        Parameter("coefficients", "numbers"),
        Parameter("variable", "word", "T", words=("T", "1/T")),
        Parameter("centre", "number", 0.0),
        Parameter("scale", "positive", 1.0),
    ),
    _exp_polynomial,
)
