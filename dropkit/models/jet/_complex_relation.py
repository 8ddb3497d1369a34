"""The relation of a jet for complex wavenumbers and growth rates; see `_viscous_relation`.

Lengths in radii, times in sqrt(rho a^3/gamma): ``x = k a``, ``t = x^2``, ``h`` the Ohnesorge number
on the radius, 0 for the inviscid jet, ``v`` the speed of the jet, the square root of its Weber
number on the radius. Everything here is arrays of one dimension.
"""

from __future__ import annotations

from typing import Any, Final

import numpy as np

from dropkit.models.jet._roots import between
from dropkit.models.jet._viscous_relation import COMPLEX_COEFFICIENTS

__all__: list[str] = []

# Where the inviscid jet turns from convectively to absolutely unstable: the inflection of
# sqrt((x^2 - 1) x I1(x)/I0(x)) and the slope there, computed to 30 digits [C].
X_CRITICAL: Final = 1.281085480192699
V_CRITICAL: Final = 1.767073931827163

# Series where both arguments lie well inside the circle of |t| = 14.68.
_INSIDE: Final = 2.6
_CLOSE: Final = 1.0
# Speeds from which a spatial wave is followed, stages of the speed, steps in each.
_FAST: Final = 6.0
_STAGES: Final = 4
_FINE_STAGES: Final = 300
_NEWTON: Final = 3
_LAST: Final = 8
# Relative last step that ends a search, and the one that passes as found.
_ROUNDING: Final = 1e-15
_FOUND: Final = 1e-9
_CLOSE_TO_TURN: Final = 0.9
_DECAY_STEPS: Final = 60
_SHORTEST: Final = 5.0


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


def spatial_wave(omega: Any, h: Any, v: Any) -> Any:
    """Complex k a at real frequency ``omega = 2 pi f a/U``: the wave downstream of its source.

    A fast jet carries temporal growth along: ``x = omega - i w/v``. From there the speed falls to v
    by stages, so that the root stays the same. What fails is tried again in smaller stages; NaN
    where those fail too.
    """
    x = _followed(omega, h, v, _STAGES)
    lost = np.isnan(x) & ~np.isnan(omega + h + v)
    if lost.any():
        x[lost] = _followed(omega[lost], h[lost], v[lost], _FINE_STAGES)
    return x


def _followed(omega: Any, h: Any, v: Any, stages: int) -> Any:
    start = np.maximum(v, _FAST)
    if not (v < _FAST).any():
        stages = 1
    x = omega - 1j * _temporal_start(omega, h) / start
    before = start
    change = np.zeros_like(x)
    for stage in range(stages + 1):
        now = v * (start / v) ** (1.0 - stage / stages)
        x = omega + (x - omega) * (before / now)
        before = now
        x, change = _newton_spatial(x, omega, h, now, _NEWTON if stage < stages else _LAST)
    return np.where(np.abs(change) <= _FOUND * np.abs(x), x, complex(np.nan, np.nan))


def _newton_spatial(x: Any, omega: Any, h: Any, v: Any, steps: int) -> tuple[Any, Any]:
    change = np.zeros_like(x)
    for _ in range(steps):
        w = 1j * v * (x - omega)
        f, f_t, f_w = relation(x * x, w, h)
        change = f / (2.0 * x * f_t + 1j * v * f_w)
        x = x - change
        if not (np.abs(change) > _ROUNDING * np.abs(x)).any():
            break
    return x, change


def _temporal_start(x: Any, h: Any) -> Any:
    """Weber's growth rate with the exact driving term, complex beyond the cut-off."""
    t = x * x
    drive = (1.0 - x) * (1.0 + x) * t / _ratio(t + 0j)[0]
    damping = 3.0 * h * t
    return 2.0 * drive / (damping + np.sqrt(damping * damping + 4.0 * drive))


def decay(x: Any, h: Any) -> Any:
    """Negative growth rate of the slowest capillary wave for 1 < x <= 5; NaN beyond."""
    with np.errstate(all="ignore"):
        x = np.where(x <= _SHORTEST, x, np.nan)
        # Off the real axis, or a real start would never find a pair of complex roots.
        w = growth_at(x + 0j, _temporal_start(x, h) * (1.0 + 0.1j), h, _DECAY_STEPS)
        f, _, f_w = relation((x * x) + 0j, w, h)
        return np.where(np.abs(f) <= _FOUND * np.abs(f_w * w), w.real, np.nan)


def inviscid_turning_point(v: Any) -> tuple[Any, Any]:
    """Where two waves of an inviscid jet become one: the real x, and omega there.

    Above that omega, which is a little below 1, no wave grows along the jet.
    """

    def slope(x: Any) -> Any:
        t = x * x
        ratio, ratio_t = _ratio(t + 0j)
        square = (t - 1.0) * t / ratio.real
        change = 2.0 * x * ((2.0 * t - 1.0) / ratio - square * ratio_t / ratio).real
        return change * change - 4.0 * v * v * square

    x = between(slope, np.ones_like(v), np.full_like(v, X_CRITICAL))
    t = x * x
    square = (t - 1.0) * t / _ratio(t + 0j)[0].real
    return x, x - np.sqrt(square) / v


def inviscid_spatial_wave(omega: Any, v: Any) -> Any:
    """As `spatial_wave`, without viscosity, for frequencies up to the turning point."""
    none = np.zeros_like(omega)
    x = spatial_wave(omega, none, v)
    turn, last = inviscid_turning_point(v)
    close = omega > _CLOSE_TO_TURN * last
    if close.any():
        near, there, speed = turn[close], last[close], v[close]
        step = 1e-4 * near
        curvature = (
            _mismatch(near + step, there, speed)
            - 2.0 * _mismatch(near, there, speed)
            + _mismatch(near - step, there, speed)
        ) / (step * step)
        push = 2.0 * speed * speed * (near - there) * (omega[close] - there)
        start = near - 1j * np.sqrt(np.maximum(2.0 * push / curvature, 0.0))
        found, _ = _newton_spatial(start, omega[close], none[close], speed, _DECAY_STEPS)
        x[close] = found
    return x


def _mismatch(x: Any, omega: Any, v: Any) -> Any:
    t = x * x
    return (t - 1.0) * t / _ratio(t + 0j)[0].real - v * v * (x - omega) ** 2
