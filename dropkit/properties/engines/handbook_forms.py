"""Equation forms that only handbooks' coefficient tables need; the others are dropkit's own."""

from __future__ import annotations

from math import cbrt, exp

import numpy as np

from dropkit.properties.equations.form import ArrayBody, FloatArray, Form, Parameter, ScalarBody

__all__ = ["PPDS9"]


def _ppds9(coefficients: tuple[float, ...], unit: float) -> tuple[ScalarBody, ArrayBody]:
    a, b, c, d, e = coefficients
    whole = e * unit

    def scalar(T: float) -> float:
        x = (c - T) / (T - d)
        return whole * exp(cbrt(x) * (b * x + a))

    def array(T: FloatArray, out: FloatArray) -> None:
        x = np.subtract(c, T)
        np.divide(x, np.subtract(T, d), out=x)
        np.cbrt(x, out=out)
        np.multiply(x, b, out=x)
        np.add(x, a, out=x)
        np.multiply(out, x, out=out)
        np.exp(out, out=out)
        np.multiply(out, whole, out=out)

    return scalar, array


PPDS9 = Form(
    "ppds9",
    "E exp(A x^(1/3) + B x^(4/3)), x = (C - T)/(T - D), coefficients [A, B, C, D, E]",
    (Parameter("coefficients", "numbers", size=(5, 5)),),
    _ppds9,
)
