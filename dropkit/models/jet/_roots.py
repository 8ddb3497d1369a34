"""Roots between two ends for many elements at once."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any, Final

import numpy as np

__all__: list[str] = []

_MOST: Final = 80


def between(function: Callable[[Any], Any], low: Any, high: Any) -> Any:
    """Where a function of arrays changes its sign, by Chandrupatla's method.

    Inverse quadratic steps where they are safe, halving elsewhere. Where the ends have one sign the
    end with the smaller value comes back: there the root lies on the end, to rounding.
    """
    b, a = np.array(low, dtype=float), np.array(high, dtype=float)
    f_b, f_a = function(b), function(a)
    same = np.sign(f_a) == np.sign(f_b)
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
    return best
