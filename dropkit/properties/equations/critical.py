"""Powers of temperature, and of the distance to the critical point.

Surface tension, density and heat of vaporisation up to the critical temperature.
"""

from __future__ import annotations

from math import pow as power_of

import numpy as np

from dropkit.properties.equations.form import (
    ArrayBody,
    FloatArray,
    Form,
    Parameter,
    ScalarBody,
    scale_by,
)
from dropkit.properties.equations.polynomials import horner, horner_into

__all__ = [
    "CRITICAL_POWERS",
    "GUGGENHEIM",
    "POWER",
    "POWERS",
    "RACKETT",
    "WATSON",
    "pair_up",
    "sum_of_powers",
    "sum_of_powers_into",
]


def _distance(T: FloatArray, critical_temperature: float) -> FloatArray:
    """1 - T/critical_temperature in a new chunk buffer."""
    tau = np.divide(T, critical_temperature)
    return np.subtract(1.0, tau, out=tau)


def sum_of_powers(terms: tuple[tuple[float, float], ...]) -> ScalarBody:
    """The sum of s x^n over pairs (s, n), as a function of one float x >= 0.

    Examples
    --------
    >>> sum_of_powers(((2.0, 0.5), (1.0, 2.0)))(4.0)
    20.0
    """
    if len(terms) == 1:
        ((s, n),) = terms
        return lambda x: s * power_of(x, n)
    family = _one_family(terms)
    if family is not None:
        lowest, coefficients = family
        series = horner(coefficients)
        return lambda x: power_of(x, lowest) * series(x)
    if len(terms) <= 3:
        # Written out, padded with terms that are zero.
        (s0, n0), (s1, n1), (s2, n2) = (*terms, (0.0, 1.0), (0.0, 1.0))[:3]
        return lambda x: s0 * power_of(x, n0) + s1 * power_of(x, n1) + s2 * power_of(x, n2)

    def long(x: float) -> float:
        y = 0.0
        for s, n in terms:
            y += s * power_of(x, n)
        return y

    return long


def sum_of_powers_into(
    terms: tuple[tuple[float, float], ...], x: FloatArray, out: FloatArray
) -> None:
    """Write the sum of s x^n over pairs (s, n) of an array into another."""
    if len(terms) == 1:
        ((s, n),) = terms
        np.power(x, n, out=out)
        scale_by(out, s)
        return
    buffer = np.empty_like(out)
    family = _one_family(terms)
    if family is not None:
        lowest, coefficients = family
        np.power(x, lowest, out=out)
        horner_into(coefficients, x, buffer)
        np.multiply(out, buffer, out=out)
        return
    (first, n), *rest = terms
    np.power(x, n, out=out)
    np.multiply(out, first, out=out)
    for s, n in rest:
        np.power(x, n, out=buffer)
        np.multiply(buffer, s, out=buffer)
        np.add(out, buffer, out=out)


def _one_family(
    terms: tuple[tuple[float, float], ...],
) -> tuple[float, tuple[float, ...]] | None:
    """Lowest exponent and coefficients, where all exponents lie whole steps above it.

    Then one power and a polynomial do: the equation of IAPWS for water is of this kind, and a
    power costs as much as ten multiplications.
    """
    lowest = min(n for _, n in terms)
    steps = [n - lowest for _, n in terms]
    whole = [round(step) for step in steps]
    if max(whole) > 8 or any(abs(a - b) > 1e-14 for a, b in zip(steps, whole, strict=True)):
        return None
    coefficients = [0.0] * (max(whole) + 1)
    for (s, _), step in zip(terms, whole, strict=True):
        coefficients[step] += s
    return lowest, tuple(coefficients)


def pair_up(
    coefficients: tuple[float, ...], exponents: tuple[float, ...]
) -> tuple[tuple[float, float], ...]:
    """Coefficient and exponent of each term; ValueError if their numbers differ."""
    if len(coefficients) != len(exponents):
        raise ValueError(f"has {len(coefficients)} coefficients but {len(exponents)} exponents")
    return tuple(zip(coefficients, exponents, strict=True))


def _critical_powers(
    coefficients: tuple[float, ...],
    exponents: tuple[float, ...],
    critical_temperature: float,
    factor: float,
    unit: float,
) -> tuple[ScalarBody, ArrayBody]:
    terms = pair_up(coefficients, exponents)
    series = sum_of_powers(terms)
    whole = factor * unit

    def scalar(T: float) -> float:
        return series(1.0 - T / critical_temperature) * whole

    def array(T: FloatArray, out: FloatArray) -> None:
        sum_of_powers_into(terms, _distance(T, critical_temperature), out)
        scale_by(out, whole)

    return scalar, array


def _guggenheim(
    s0: float, n: float, critical_temperature: float, unit: float
) -> tuple[ScalarBody, ArrayBody]:
    return _critical_powers((s0,), (n,), critical_temperature, 1.0, unit)


def _power(
    A: float, n: float, reference_temperature: float, unit: float
) -> tuple[ScalarBody, ArrayBody]:
    return _powers((A,), (n,), reference_temperature, unit)


def _powers(
    coefficients: tuple[float, ...],
    exponents: tuple[float, ...],
    reference_temperature: float,
    unit: float,
) -> tuple[ScalarBody, ArrayBody]:
    terms = pair_up(coefficients, exponents)
    series = sum_of_powers(terms)

    def scalar(T: float) -> float:
        return series(T / reference_temperature) * unit

    def array(T: FloatArray, out: FloatArray) -> None:
        sum_of_powers_into(terms, np.divide(T, reference_temperature), out)
        scale_by(out, unit)

    return scalar, array


def _rackett(coefficients: tuple[float, ...], unit: float) -> tuple[ScalarBody, ArrayBody]:
    a, b, c, d = coefficients
    whole = a * unit

    def scalar(T: float) -> float:
        return whole / power_of(b, 1.0 + power_of(1.0 - T / c, d))

    def array(T: FloatArray, out: FloatArray) -> None:
        np.divide(T, c, out=out)
        np.subtract(1.0, out, out=out)
        np.power(out, d, out=out)
        np.add(out, 1.0, out=out)
        np.power(b, out, out=out)
        np.divide(whole, out, out=out)

    return scalar, array


def _watson(
    coefficients: tuple[float, ...], critical_temperature: float, unit: float
) -> tuple[ScalarBody, ArrayBody]:
    a, *rest = coefficients
    exponent = tuple(rest)
    series = horner(exponent)
    whole = a * unit

    def scalar(T: float) -> float:
        reduced = T / critical_temperature
        return whole * power_of(1.0 - reduced, series(reduced))

    def array(T: FloatArray, out: FloatArray) -> None:
        reduced = np.divide(T, critical_temperature)
        if len(exponent) == 1:
            np.subtract(1.0, reduced, out=reduced)
            np.power(reduced, exponent[0], out=out)
        else:
            horner_into(exponent, reduced, out)
            np.subtract(1.0, reduced, out=reduced)
            np.power(reduced, out, out=out)
        np.multiply(out, whole, out=out)

    return scalar, array


_CRITICAL_TEMPERATURE = Parameter("critical_temperature", "positive")
_REFERENCE_TEMPERATURE = Parameter("reference_temperature", "positive")
_COEFFICIENTS = Parameter("coefficients", "numbers")
_EXPONENTS = Parameter("exponents", "numbers")

CRITICAL_POWERS = Form(
    "critical_powers",
    "factor * sum s_i (1 - T/critical_temperature)^n_i",
    (_COEFFICIENTS, _EXPONENTS, _CRITICAL_TEMPERATURE, Parameter("factor", "number", 1.0)),
    _critical_powers,
)
GUGGENHEIM = Form(
    "guggenheim",
    "s0 (1 - T/critical_temperature)^n",
    (Parameter("s0"), Parameter("n"), _CRITICAL_TEMPERATURE),
    _guggenheim,
)
POWER = Form(
    "power",
    "A (T/reference_temperature)^n",
    (Parameter("A"), Parameter("n"), _REFERENCE_TEMPERATURE),
    _power,
)
POWERS = Form(
    "powers",
    "sum a_i (T/reference_temperature)^n_i",
    (_COEFFICIENTS, _EXPONENTS, _REFERENCE_TEMPERATURE),
    _powers,
)
RACKETT = Form(
    "rackett",
    "A / B^(1 + (1 - T/C)^D), coefficients [A, B, C, D] (DIPPR 105)",
    (Parameter("coefficients", "numbers", size=(4, 4)),),
    _rackett,
)
WATSON = Form(
    "watson",
    "A (1 - Tr)^(B + C Tr + D Tr^2 + ...), Tr = T/critical_temperature (DIPPR 106)",
    (Parameter("coefficients", "numbers", size=(2, 6)), _CRITICAL_TEMPERATURE),
    _watson,
)
