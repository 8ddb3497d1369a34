"""The full relation of a viscous jet, written so that no difference loses digits.

Lengths in radii a, times in sqrt(rho a^3/gamma): ``t = (k a)^2``, ``w`` the growth rate, ``h`` the
Ohnesorge number on the radius, ``s = w/h``. With ``F(t) = x I0(x)/I1(x)``, ``x = sqrt(t)``, and its
divided difference ``G = (F(t + s) - F(t))/s`` the relation of Rayleigh and Chandrasekhar becomes

    w^2 + h t c w = t (1 - t)/F(t),      c = 4 - (2 + 4 t G)/F(t).

All terms of c are of order 1 at every h, and c tends to 3 for long waves: Weber's equation. F is
analytic with its nearest pole at t = -14.68, so that near the origin F, G and their derivatives come
from one power series; further off G is a plain difference, which is then harmless.
"""

from __future__ import annotations

from collections.abc import Callable
from typing import Any, Final

import numpy as np

__all__: list[str] = []

# Elements worked on together: what one step needs then stays in the cache.
CHUNK: Final = 4096
# Steps from Weber's root: each takes c as linear in s about the last s and solves a quadratic. The
# error falls from 3e-2 of w to 4e-7 and then to rounding.
STEPS: Final = 2
# Newton's steps from Weber's edges of a band; near a share of 1 each halves the distance first.
EDGE_STEPS: Final = 7
# Chebyshev coefficients, highest first, of t (2 + 3 sqrt(2) h) at the fastest wave in
# (sqrt(h) - 1)/(sqrt(h) + 1): a start within 6e-5, fitted to roots of this relation.
_START: Final = (0.000296, -0.000546, -0.000259, 0.002329, -0.002438, -0.004405, 0.016599, 0.98846)


def _coefficients(count: int) -> tuple[float, ...]:
    """Coefficients of F in powers of t, by its own equation 2 t F' = t + 2 F - F^2."""
    found = [2.0]
    for n in range(1, count):
        inner = sum(found[i] * found[n - i] for i in range(1, n))
        found.append(((1.0 if n == 1 else 0.0) - inner) / (2.0 * n + 2.0))
    return tuple(reversed(found))


# For |t| <= 2.2 the last of 21 terms is below 1e-17; for complex waves |t| reaches 3.6.
_REAL: Final = _coefficients(21)
COMPLEX_COEFFICIENTS: Final = _coefficients(31)


def ratio_and_slope(t: Any) -> tuple[Any, Any]:
    """F and dF/dt for 0 <= t <= 2."""
    value, slope = _REAL[0], 0.0
    for coefficient in _REAL[1:]:
        slope = slope * t + value
        value = value * t + coefficient
    return value, slope


def _difference_near(t: Any, u: Any) -> tuple[Any, Any]:
    """G and dG/ds from the series, u = t + s."""
    value: Any = _REAL[0]
    slope: Any = 0.0
    g: Any = 0.0
    g_s: Any = 0.0
    for coefficient in _REAL[1:]:
        g_s = g_s * t + slope
        g = g * t + value
        slope = slope * u + value
        value = value * u + coefficient
    return g, g_s


def _difference_far(t: Any, s: Any, ratio: Any) -> tuple[Any, Any]:
    """G and dG/ds as differences, for s above about 1."""
    from scipy.special import i0e, i1e

    u = t + s
    y = u**0.5
    there = y * (i0e(y) / i1e(y))
    g = (there - ratio) / s
    slope = (u + 2.0 * there - there * there) / (2.0 * u)
    return g, (slope - g) / s


def _partials_near(t: Any, u: Any) -> tuple[Any, Any]:
    """G and its derivative by t at constant s, from the series."""
    value: Any = _REAL[0]
    slope: Any = 0.0
    g: Any = 0.0
    g_u: Any = 0.0
    g_t: Any = 0.0
    for coefficient in _REAL[1:]:
        g_t = g_t * t + g
        g_u = g_u * t + slope
        g = g * t + value
        slope = slope * u + value
        value = value * u + coefficient
    return g, g_t + g_u


def _partials_far(t: Any, s: Any, ratio: Any, ratio_t: Any) -> tuple[Any, Any]:
    """G and its derivative by t at constant s, as differences."""
    from scipy.special import i0e, i1e

    u = t + s
    y = u**0.5
    there = y * (i0e(y) / i1e(y))
    slope = (u + 2.0 * there - there * there) / (2.0 * u)
    return (there - ratio) / s, (slope - ratio_t) / s


def _parts(t: Any, w: Any, h: Any, near: bool) -> tuple[Any, Any]:
    """The relation over t, and its derivative by t at constant w.

    ``v = w^2/t + h c w - P`` with ``P = (1 - t)/F``: at a root v = 0, at the fastest wave v_t = 0.
    Its three terms stay of one size for every h.
    """
    ratio, ratio_t = ratio_and_slope(t)
    s = w / h
    g, g_t = _partials_near(t, t + s) if near else _partials_far(t, s, ratio, ratio_t)
    inner = 2.0 + 4.0 * t * g
    c = 4.0 - inner / ratio
    c_t = (inner * ratio_t / ratio - 4.0 * (g + t * g_t)) / ratio
    pull = (1.0 - t) / ratio
    pull_t = -(1.0 + pull * ratio_t) / ratio
    square = w * w / t
    return square + h * c * w - pull, h * w * c_t - pull_t - square / t


def _solve(t: Any, h: Any, ratio: Any, drive: Any, near: bool) -> Any:
    """The growing root, from Weber's; the same lines for floats and arrays."""
    damping = 3.0 * h * t
    w = 2.0 * drive / (damping + (damping * damping + 4.0 * drive) ** 0.5)
    for _ in range(STEPS):
        s = w / h
        g, g_s = _difference_near(t, t + s) if near else _difference_far(t, s, ratio)
        c = 4.0 - (2.0 + 4.0 * t * g) / ratio
        c_s = -4.0 * t * g_s / ratio
        first = h * t * (c - c_s * s)
        w = 2.0 * drive / (first + (first * first + 4.0 * (1.0 + t * c_s) * drive) ** 0.5)
    return w


def growth(x: Any, h: Any) -> Any:
    """Growth rate for 0 < x <= 1 and any h > 0, floats or arrays."""
    return mapped(_growth, x, h)


def fastest(h: Any) -> tuple[Any, Any]:
    """t and w of the fastest wave at any h > 0."""
    found: tuple[Any, Any] = mapped(_fastest, h)
    return found


def band(h: Any, share: Any) -> tuple[Any, Any]:
    """Ends in t of the band where w keeps a share, in 0 to 1, of its maximum."""
    found: tuple[Any, Any] = mapped(_band, h, share)
    return found


def _growth(x: Any, h: Any) -> Any:
    t = x * x
    ratio, _ = ratio_and_slope(t)
    drive = (1.0 - x) * (1.0 + x) * t / ratio
    damping = 3.0 * h * t
    start = 2.0 * drive / (damping + (damping * damping + 4.0 * drive) ** 0.5)
    return _by_branch(_solve, start <= h, t, h, ratio, drive)


def _fastest(h: Any) -> tuple[Any, Any]:
    root = h**0.5
    z = (root - 1.0) / (root + 1.0)
    # Clenshaw's sum of the start's series.
    later: Any = 0.0
    last: Any = 0.0
    for coefficient in _START[:-1]:
        later, last = 2.0 * z * later - last + coefficient, later
    start = z * later - last + _START[-1]
    t = start / (2.0 + 3.0 * 2.0**0.5 * h)
    near = 1.0 / (8.0**0.5 + 6.0 * h) <= h
    found: tuple[Any, Any] = _by_branch(_climb, near, t, h)
    return found


def _climb(t: Any, h: Any, near: bool) -> tuple[Any, Any]:
    """From a start within 1e-4 to the maximum: one step by the leading term, two secants."""
    ratio, _ = ratio_and_slope(t)
    w = _solve(t, h, ratio, (1.0 - t) * t / ratio, near)
    _, slope = _parts(t, w, h, near)
    step = -slope * t * t * t / (2.0 * w * w)
    for _ in range(2):
        t = t + step
        ratio, _ = ratio_and_slope(t)
        w = _solve(t, h, ratio, (1.0 - t) * t / ratio, near)
        _, after = _parts(t, w, h, near)
        change = after - slope
        step = -after * step / (change + (change == 0.0))
        slope = after
    t = t + step
    ratio, _ = ratio_and_slope(t)
    return t, _solve(t, h, ratio, (1.0 - t) * t / ratio, near)


def _band(h: Any, share: Any) -> tuple[Any, Any]:
    most, fast = _fastest(h)
    w = share * fast
    low, high = longwave_band(h, share)
    # Weber's edges, moved so that his maximum falls on this one.
    longwave = 1.0 / (2.0 + 3.0 * 2.0**0.5 * h)
    low = low * (most / longwave)
    high = 1.0 - (1.0 - high) * ((1.0 - most) / (1.0 - longwave))
    near = w <= h
    low, high = _by_branch(_edge, near, low, w, h), _by_branch(_edge, near, high, w, h)
    return np.minimum(low, most), np.maximum(high, most)


def _edge(t: Any, w: Any, h: Any, near: bool) -> Any:
    return _newton_edge(t, w, lambda t: _parts(t, w, h, near))


def _newton_edge(t: Any, w: Any, parts: Callable[[Any], tuple[Any, Any]]) -> Any:
    """Newton's steps in t at constant w; no step where the relation holds to rounding."""
    for _ in range(EDGE_STEPS):
        value, slope = parts(t)
        small = abs(value) <= 1e-15 * (w * w / t + 0.5)
        t = t - (1.0 - small) * value / (value / t + slope + small)
        if np.all(small):
            break
    return t


def inviscid_band(share: Any, most: float, fast: float) -> tuple[Any, Any]:
    """Ends in t of the band of the inviscid relation, with its maximum w at t given."""
    found: tuple[Any, Any] = mapped(lambda share: _inviscid_band(share, most, fast), share)
    return found


def _inviscid_band(share: Any, most: float, fast: float) -> tuple[Any, Any]:
    w = share * fast

    def parts(t: Any) -> tuple[Any, Any]:
        ratio, ratio_t = ratio_and_slope(t)
        pull = (1.0 - t) / ratio
        return w * w / t - pull, (1.0 + pull * ratio_t) / ratio - w * w / (t * t)

    low, high = longwave_band(0.0, share)
    low = _newton_edge(low * (most / 0.5), w, parts)
    high = _newton_edge(1.0 - (1.0 - high) * ((1.0 - most) / 0.5), w, parts)
    return np.minimum(low, most), np.maximum(high, most)


def longwave_band(h: Any, share: Any) -> tuple[Any, Any]:
    """The same for Weber's equation, in closed form without differences."""
    scale = 8.0**0.5 + 6.0 * h
    middle = 8.0**0.5 + 6.0 * h * (1.0 - share)
    apart = (1.0 - share) * scale * (middle + 8.0**0.5 * share)
    high = (middle + apart**0.5) / (2.0 * scale)
    return 2.0 * (share / scale) ** 2 / high, high


def _by_branch(work: Callable[..., Any], near: Any, *given: Any) -> Any:
    """Work done with the series where near, with differences elsewhere."""
    if not isinstance(near, np.ndarray):
        return work(*given, bool(near))
    count = np.count_nonzero(near)
    if count == 0 or count == near.size:
        return work(*given, bool(count))
    parts = [
        (mask, work(*(one[mask] for one in given), kind))
        for mask, kind in ((near, True), (~near, False))
    ]
    several = isinstance(parts[0][1], tuple)
    results = tuple(np.empty(near.shape) for _ in (parts[0][1] if several else (0,)))
    for mask, found in parts:
        for whole, piece in zip(results, found if several else (found,), strict=True):
            whole[mask] = piece
    return results if several else results[0]


def mapped(block: Callable[..., Any], *given: Any) -> Any:
    """A function of floats, or of arrays in blocks that fit the cache."""
    if not any(isinstance(one, np.ndarray) for one in given):
        with np.errstate(all="ignore"):
            result = block(*map(float, given))
        return tuple(map(float, result)) if isinstance(result, tuple) else float(result)
    whole = np.broadcast_arrays(*given)
    shape = whole[0].shape
    flat = [one.reshape(-1) for one in whole]
    size = flat[0].size
    found = []
    with np.errstate(all="ignore"):
        for begin in range(0, max(size, 1), CHUNK):
            found.append(block(*(one[begin : begin + CHUNK] for one in flat)))
    if not isinstance(found[0], tuple):
        return np.concatenate(found).reshape(shape)
    return tuple(np.concatenate(one).reshape(shape) for one in zip(*found, strict=True))
