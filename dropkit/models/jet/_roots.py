"""Roots between two ends for many elements at once."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any, Final

import numpy as np

__all__: list[str] = []

_MOST: Final = 80
# Relative last step of Newton's method after which the next one would be below rounding.
_SETTLED: Final = 1e-9
_NEWTON: Final = 7


def between(function: Callable[[Any], Any], low: Any, high: Any) -> Any:
    """Where a function of arrays changes its sign, by Chandrupatla's method.

    Inverse quadratic steps where they are safe, halving elsewhere. Where the ends have one sign the
    end with the smaller value comes back: there the root lies on the end, to rounding. NaN at an
    end gives NaN.
    """
    b, a = np.array(low, dtype=float), np.array(high, dtype=float)
    f_b, f_a = function(b), function(a)
    unknown = np.isnan(a) | np.isnan(b) | np.isnan(f_a) | np.isnan(f_b)
    same = unknown | (np.sign(f_a) == np.sign(f_b))
    share = np.full(b.shape, 0.5)
    best = np.where(np.abs(f_a) < np.abs(f_b), a, b)
    for _ in range(_MOST):
        middle = a + share * (b - a)
        f_m = function(middle)
        keeps = np.sign(f_m) == np.sign(f_a)
        # c is the end that the step leaves behind.
        c, f_c = np.where(keeps, a, b), np.where(keeps, f_a, f_b)
        b, f_b = np.where(keeps, b, a), np.where(keeps, f_b, f_a)
        a, f_a = middle, f_m
        best = np.where(same, best, np.where(np.abs(f_a) < np.abs(f_b), a, b))
        reach = 2.0 * np.finfo(float).eps * np.abs(best)
        width = np.abs(b - a)
        done = same | (width <= 2.0 * reach) | (f_a == 0.0) | ~(width > 0.0)
        if done.all():
            break
        xi, phi = (a - b) / (c - b), (f_a - f_b) / (f_c - f_b)
        curved = (phi * phi < xi) & ((1.0 - phi) ** 2 < 1.0 - xi)
        step = f_a / (f_b - f_a) * f_c / (f_b - f_c) + (c - a) / (b - a) * f_a / (f_c - f_a) * (
            f_b / (f_c - f_b)
        )
        share = np.where(curved & np.isfinite(step), step, 0.5)
        edge = np.minimum(0.5, reach / np.where(width > 0.0, width, 1.0))
        share = np.clip(share, edge, 1.0 - edge)
    return np.where(unknown, np.nan, best)


def newton_within(
    function: Callable[..., tuple[Any, Any]], start: Any, low: Any, high: Any, *given: Any
) -> Any:
    """Where a function changes its sign between two ends, first by Newton's method.

    The function takes x and what else is given, and gives its value and slope. Elements whose last
    step was not near rounding, or left the ends, are done again by `between` on a logarithmic scale.
    """
    x = start
    change: Any = np.inf
    for _ in range(_NEWTON):
        value, slope = function(x, *given)
        change = value / slope
        x = x - change
        if np.all(abs(change) <= _SETTLED * abs(x)):
            break
    good = (abs(change) <= _SETTLED * abs(x)) & (x >= low) & (x <= high)
    if np.all(good):
        return x
    bad = ~np.atleast_1d(good)
    some = [np.atleast_1d(one)[bad] for one in (low, high, *given)]
    safe = np.exp(
        between(lambda y: function(np.exp(y), *some[2:])[0], np.log(some[0]), np.log(some[1]))
    )
    result = np.atleast_1d(x).astype(float)
    result[bad] = safe
    return result.reshape(np.shape(x))
