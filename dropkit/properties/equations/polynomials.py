"""Polynomials of temperature and their ratio.

One routine evaluates all of them by Horner's rule, so that the scalar and the array body do the
same operations in the same order and agree to the last bit.
"""

from __future__ import annotations

import numpy as np

from dropkit.properties.equations.form import (
    ArrayBody,
    FloatArray,
    Form,
    Parameter,
    ScalarBody,
    scale_by,
)

__all__ = ["CONSTANT", "POLYNOMIAL", "RATIONAL", "horner", "horner_into", "series_in"]


def horner(coefficients: tuple[float, ...]) -> ScalarBody:
    """The polynomial c0 + c1 z + c2 z^2 + ... as a function of one float.

    Examples
    --------
    >>> horner((1.0, 2.0, 3.0))(2.0)
    17.0
    """
    if len(coefficients) <= 4:
        # Written out, padded with zeros: a loop costs twice as much.
        c0, c1, c2, c3 = (*coefficients, 0.0, 0.0, 0.0)[:4]
        return lambda z: ((c3 * z + c2) * z + c1) * z + c0
    if len(coefficients) <= 7:
        c0, c1, c2, c3, c4, c5, c6 = (*coefficients, 0.0, 0.0)[:7]
        return lambda z: (((((c6 * z + c5) * z + c4) * z + c3) * z + c2) * z + c1) * z + c0
    last, *rest = reversed(coefficients)

    def long(z: float) -> float:
        y = last
        for c in rest:
            y = y * z + c
        return y

    return long


def series_in(coefficients: tuple[float, ...], centre: float, scale: float) -> ScalarBody:
    """The polynomial in z = (T - centre)/scale as a function of one float T.

    Examples
    --------
    >>> series_in((1.0, 2.0), 300.0, 10.0)(320.0)
    5.0
    """
    if len(coefficients) <= 6:
        c0, c1, c2, c3, c4, c5 = (*coefficients, *[0.0] * 5)[:6]

        def short(T: float) -> float:
            z = (T - centre) / scale
            return ((((c5 * z + c4) * z + c3) * z + c2) * z + c1) * z + c0

        return short
    series = horner(coefficients)
    return lambda T: series((T - centre) / scale)


def horner_into(coefficients: tuple[float, ...], z: FloatArray, out: FloatArray) -> None:
    """Write the polynomial c0 + c1 z + c2 z^2 + ... of an array into another."""
    if len(coefficients) == 1:
        out.fill(coefficients[0])
        return
    *rest, before, last = coefficients
    np.multiply(z, last, out=out)
    np.add(out, before, out=out)
    for c in reversed(rest):
        np.multiply(out, z, out=out)
        np.add(out, c, out=out)


def _reduced(T: FloatArray, centre: float, scale: float) -> FloatArray:
    """(T - centre)/scale in a new chunk buffer; the argument itself where nothing is to do."""
    if centre == 0.0 and scale == 1.0:
        return T
    z = np.subtract(T, centre)
    if scale != 1.0:
        np.divide(z, scale, out=z)
    return z


def _constant(value: float, unit: float) -> tuple[ScalarBody, ArrayBody]:
    constant = value * unit

    def array(T: FloatArray, out: FloatArray) -> None:
        # Zero times the argument keeps NaN where the temperature is NaN.
        np.multiply(T, 0.0, out=out)
        np.add(out, constant, out=out)

    return lambda T: T * 0.0 + constant, array


def _polynomial(
    coefficients: tuple[float, ...], centre: float, scale: float, unit: float
) -> tuple[ScalarBody, ArrayBody]:
    series = series_in(coefficients, centre, scale)

    def array(T: FloatArray, out: FloatArray) -> None:
        horner_into(coefficients, _reduced(T, centre, scale), out)
        scale_by(out, unit)

    return (series if unit == 1.0 else lambda T: series(T) * unit), array


def _rational(
    numerator: tuple[float, ...],
    denominator: tuple[float, ...],
    centre: float,
    scale: float,
    unit: float,
) -> tuple[ScalarBody, ArrayBody]:
    above, below = horner(numerator), horner(denominator)

    def scalar(T: float) -> float:
        z = (T - centre) / scale
        return above(z) / below(z) * unit

    def array(T: FloatArray, out: FloatArray) -> None:
        z = _reduced(T, centre, scale)
        horner_into(numerator, z, out)
        divisor = np.empty_like(out)
        horner_into(denominator, z, divisor)
        np.divide(out, divisor, out=out)
        scale_by(out, unit)

    return scalar, array


_CENTRE = Parameter("centre", "number", 0.0)
_SCALE = Parameter("scale", "positive", 1.0)

CONSTANT = Form("constant", "value", (Parameter("value"),), _constant)
POLYNOMIAL = Form(
    "polynomial",
    "sum c_i z^i, z = (T - centre)/scale",
    (Parameter("coefficients", "numbers"), _CENTRE, _SCALE),
    _polynomial,
)
RATIONAL = Form(
    "rational",
    "p(z)/q(z), z = (T - centre)/scale",
    (Parameter("numerator", "numbers"), Parameter("denominator", "numbers"), _CENTRE, _SCALE),
    _rational,
)
