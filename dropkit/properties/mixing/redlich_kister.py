"""Excess of a pair in Redlich-Kister form, and its sum over the pairs of a mixture.

With a transform f (logarithm, reciprocal or none) and fractions x on the record's basis,

    f(y) = sum_i x_i f(y_i) + sum_{i<j} x_i x_j sum_k A_k(T) d_ij^k,
    d_ij = (x_i - x_j) / (x_i + x_j),  A_k(T) = sum_j c_kj th^j,  th = (T - 298.15 K) / 100 K.

For two components d is the usual difference of fractions. For more, each pair enters at
its own ratio (Kohler's extension), without a ternary term.

References
----------
O. Redlich, A. T. Kister, Ind. Eng. Chem. 40 (1948) 345-348, for the pair; the extension
goes under the name of F. Kohler, Monatsh. Chem. 91 (1960) 738 (both from memory).
"""

from __future__ import annotations

import math
from collections.abc import Callable, Sequence
from typing import Any, Final

import numpy as np

from dropkit.errors import RecordError
from dropkit.properties.curves import FloatArray
from dropkit.records import PropertyRecord

__all__ = ["RULES", "PairExcess", "collapse", "reduced_temperature"]

# Property -> (transform, basis): one rule per property, so that pairs can be added up.
RULES: Final[dict[str, tuple[str, str]]] = {
    "density": ("reciprocal", "mass"),
    "viscosity": ("log", "volume"),
    "surface_tension": ("log", "volume"),
    "refractive_index": ("linear", "volume"),
}


def reduced_temperature(temperature: Any) -> Any:
    """The variable th = (T - 298.15 K) / 100 K of the coefficients."""
    return (temperature - 298.15) * 0.01


class PairExcess:
    """The excess of one pair, from its record.

    Parameters
    ----------
    record : PropertyRecord
        Of form ``redlich_kister``.
    """

    def __init__(self, record: PropertyRecord) -> None:
        rule = (record.parameters["transform"], record.parameters["basis"])
        if rule != RULES[record.property]:
            raise RecordError(
                f"{record.label} mixes by {rule[0]} on {rule[1]} fractions",
                allowed=f"{record.property}: {' on '.join(RULES[record.property])} fractions",
            )
        self.record = record
        rows = [list(map(float, row)) for row in record.parameters["coefficients"]]
        width = max(map(len, rows))
        self.rows = tuple(tuple(row + [0.0] * (width - len(row))) for row in rows)

    def at_composition(self, first: float, second: float) -> list[float]:
        """Coefficients in powers of th of the excess at fixed fractions of the pair."""
        total = first + second
        if total == 0.0:
            return [0.0]
        difference = (first - second) / total
        sums = [0.0] * len(self.rows[0])
        power = first * second
        for row in self.rows:
            for place, value in enumerate(row):
                sums[place] += power * value
            power *= difference
        return sums

    def add(
        self,
        first: Any,
        second: Any,
        reduced: FloatArray,
        out: FloatArray,
        *,
        binary: bool,
    ) -> None:
        """Add the excess to `out`, a flat chunk; fractions are floats or arrays like it."""
        if not isinstance(first, np.ndarray) and not isinstance(second, np.ndarray):
            out += _horner(self.at_composition(first, second), reduced)
            return
        difference = first - second
        if not binary:
            total = first + second
            np.divide(difference, total, out=difference, where=total > 0.0)
        sums = _horner(self.rows[-1], reduced)
        for row in self.rows[-2::-1]:
            sums *= difference
            sums += _horner(row, reduced)
        sums *= first
        sums *= second
        out += sums


def _horner(coefficients: Sequence[float], variable: FloatArray) -> FloatArray:
    sums = np.full(variable.shape, coefficients[-1])
    for value in coefficients[-2::-1]:
        sums *= variable
        sums += value
    return sums


def collapse(
    transform: str,
    ends: Sequence[Callable[[float], float]],
    fractions: Sequence[float],
    excess: Sequence[Sequence[float]],
) -> Callable[[float], float]:
    """A scalar function of temperature for one composition, with all pairs summed beforehand.

    Parameters
    ----------
    transform : {"log", "reciprocal", "linear"}
        The f of the rule.
    ends : sequence of callables
        The pure liquids' property [SI] at a temperature [K].
    fractions : sequence of float
        On the rule's basis.
    excess : sequence of sequences
        Of each pair, coefficients in powers of th, as `PairExcess.at_composition` gives them.
    """
    width = max((len(row) for row in excess), default=1)
    sums = [sum(row[j] for row in excess if j < len(row)) for j in range(width)]
    terms = list(zip(fractions, ends, strict=True))
    reverse = sums[::-1]

    def total(temperature: float) -> float:
        th = (temperature - 298.15) * 0.01
        value = 0.0
        for coefficient in reverse:
            value = value * th + coefficient
        return value

    if transform == "log":
        log, exp = math.log, math.exp
        if len(terms) == 2 and width <= 3:
            (x1, y1), (x2, y2) = terms
            c0, c1, c2 = [*sums, 0.0, 0.0][:3]

            def binary(temperature: float) -> float:
                th = (temperature - 298.15) * 0.01
                return exp(
                    x1 * log(y1(temperature))
                    + x2 * log(y2(temperature))
                    + (c0 + th * (c1 + th * c2))
                )

            return binary

        def mixed(temperature: float) -> float:
            value = total(temperature)
            for x, y in terms:
                value += x * log(y(temperature))
            return exp(value)

    elif transform == "reciprocal":

        def mixed(temperature: float) -> float:
            value = total(temperature)
            for x, y in terms:
                value += x / y(temperature)
            return 1.0 / value

    else:

        def mixed(temperature: float) -> float:
            value = total(temperature)
            for x, y in terms:
                value += x * y(temperature)
            return value

    return mixed
