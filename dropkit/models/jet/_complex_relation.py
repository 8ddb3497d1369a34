"""The relation of a jet for complex wavenumbers and growth rates; see `_viscous_relation`.

Lengths in radii, times in sqrt(rho a^3/gamma): ``x = k a``, ``t = x^2``, ``h`` the Ohnesorge number
on the radius, 0 for the inviscid jet, ``v`` the speed of the jet, the square root of its Weber
number on the radius. Everything here is arrays of one dimension.
"""

from __future__ import annotations

from typing import Any, Final

import numpy as np

from dropkit.models.jet._viscous_relation import COMPLEX_COEFFICIENTS

__all__: list[str] = []

# Series where both arguments lie well inside the circle of |t| = 14.68.
_INSIDE: Final = 2.6
_CLOSE: Final = 1.0


def _ratio(t: Any) -> tuple[Any, Any]:
    """F and dF/dt anywhere in the plane, between the poles on the negative axis."""
    from scipy.special import ive

    value: Any = COMPLEX_COEFFICIENTS[0]
    slope: Any = 0.0
    for coefficient in COMPLEX_COEFFICIENTS[1:]:
        slope = slope * t + value
        value = value * t + coefficient
    outside = ~(np.abs(t) < _INSIDE)
    if outside.any():
        far = t[outside]
        z = np.sqrt(far)
        there = z * (ive(0, z) / ive(1, z))
        value[outside] = there
        slope[outside] = (far + 2.0 * there - there * there) / (2.0 * far)
    return value, slope


def _difference(t: Any, s: Any, ratio: Any, ratio_t: Any) -> tuple[Any, Any, Any]:
    """G, dG/dt at constant s, and dG/ds."""
    u = t + s
    close = (np.abs(s) < _CLOSE) & (np.abs(t) < _INSIDE)
    there, there_t = _ratio(u)
    gap = np.where(close, 1.0, s)
    g, g_t = (there - ratio) / gap, (there_t - ratio_t) / gap
    g_s = (there_t - g) / gap
    if close.any():
        a, b = t[close], u[close]
        value: Any = COMPLEX_COEFFICIENTS[0]
        slope = d = d_u = d_t = 0.0 * a
        for coefficient in COMPLEX_COEFFICIENTS[1:]:
            d_t = d_t * a + d
            d_u = d_u * a + slope
            d = d * a + value
            slope = slope * b + value
            value = value * b + coefficient
        g[close], g_t[close], g_s[close] = d, d_t + d_u, d_u
    return g, g_t, g_s


def relation(t: Any, w: Any, h: Any) -> tuple[Any, Any, Any]:
    """Left minus right side of the relation, and its derivatives by t and by w."""
    ratio, ratio_t = _ratio(t)
    pull = (1.0 - t) / ratio
    f = w * w - t * pull
    f_t = t * (1.0 + pull * ratio_t) / ratio - pull
    f_w = 2.0 * w
    sticky = h > 0.0
    if sticky.any():
        s = w / np.where(sticky, h, 1.0)
        g, g_t, g_s = _difference(t, s, ratio, ratio_t)
        inner = 2.0 + 4.0 * t * g
        c = 4.0 - inner / ratio
        c_t = (inner * ratio_t / ratio - 4.0 * (g + t * g_t)) / ratio
        c_s = -4.0 * t * g_s / ratio
        f = f + h * t * c * w
        f_t = f_t + h * w * (c + t * c_t)
        f_w = f_w + t * (h * c + c_s * w)
    return f, f_t, f_w


def growth_at(x: Any, w: Any, h: Any, steps: int = 12) -> Any:
    """The root w at a complex x that a start w leads to, by Newton's method."""
    for _ in range(steps):
        f, _, f_w = relation(x * x, w, h)
        step = f / f_w
        w = w - step
        if not (np.abs(step) > 1e-15 * np.abs(w)).any():
            break
    return w
