"""Roots of one unknown for many designs at once."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any, Final

import numpy as np

__all__ = ["highest_root"]

_POINTS: Final = 37
_STEPS: Final = 90


def highest_root(
    function: Callable[[Any], Any],
    low: float,
    high: float,
    shape: tuple[int, ...],
    points: int = _POINTS,
    rough: Callable[[Any], Any] | None = None,
) -> tuple[Any, Any]:
    """The largest root in an interval for each design, and how many there are.

    Parameters
    ----------
    function : callable
        Value at an array of the unknown; NaN where it has none.
    low, high : float
        The interval.
    shape : tuple of int
        Shape of the arrays.
    points : int
        How many are tried; 2 are enough where the function is monotonic.
    rough : callable, optional
        A cheaper form of the function, good to a few per cent of a step, to find the intervals.

    Returns
    -------
    root : ndarray
        NaN where there is none.
    count : ndarray of int
        Changes of sign that were seen.
    """
    seek = rough or function
    with np.errstate(all="ignore"):
        tried = np.linspace(high, low, points)
        above = np.full(shape, tried[0])
        f_above = np.broadcast_to(seek(above), shape)
        count = np.zeros(shape, dtype=int)
        right, left = np.full(shape, np.nan), np.full(shape, np.nan)
        f_right, f_left = np.full(shape, np.nan), np.full(shape, np.nan)
        for point in tried[1:]:
            below = np.full(shape, point)
            f_below = np.broadcast_to(seek(below), shape)
            changed = (np.sign(f_above) * np.sign(f_below) < 0.0) | (f_below == 0.0)
            fresh = changed & (count == 0)
            right, left = np.where(fresh, above, right), np.where(fresh, below, left)
            f_right, f_left = np.where(fresh, f_above, f_right), np.where(fresh, f_below, f_left)
            count += changed
            above, f_above = below, f_below
        root = _refined(function, left, right, f_left, f_right)
        if rough is not None and np.any(np.abs(function(root)) > 1e-9):
            return highest_root(function, low, high, shape, points)
        return root, count


def _refined(function: Callable[[Any], Any], a: Any, b: Any, fa: Any, fb: Any) -> Any:
    """False position with Illinois' rule, and a bisection wherever it is slow."""
    side = np.zeros(np.shape(a), dtype=int)
    width = np.abs(b - a)
    c = 0.5 * (a + b)
    for step in range(_STEPS):
        c = (a * fb - b * fa) / (fb - fa)
        slow = (np.abs(b - a) > 0.5 * width) & (step % 4 == 3)
        width = np.where(step % 4 == 3, np.abs(b - a), width)
        c = np.where(slow | ~np.isfinite(c), 0.5 * (a + b), c)
        c = np.where(fa == 0.0, a, c)
        fc = function(c)
        same = np.sign(fc) == np.sign(fb)
        moved = np.abs(np.where(same, b, a) - c)
        fa = np.where(same & (side == 1), 0.5 * fa, fa)
        fb = np.where(~same & (side == -1), 0.5 * fb, fb)
        a, fa = np.where(same, a, c), np.where(same, fa, fc)
        b, fb = np.where(same, c, b), np.where(same, fc, fb)
        side = np.where(same, 1, -1)
        scale = 4e-16 * np.maximum(1.0, np.abs(c))
        if not np.any((moved > scale) & (np.abs(b - a) > scale) & (fc != 0.0)):
            break
    return c
