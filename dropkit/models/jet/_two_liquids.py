"""Stokes flow inside and outside of a liquid thread: stresses on its surface from its velocities.

On either side of the surface two solutions of the Stokes equations remain finite. Written for the
velocities of the surface, radial R and axial Z, the stresses of one side are a symmetric matrix with
one Bessel ratio in it: inside ``F = x I0/I1`` and ``D = t + 2 F - F^2``, outside the same with
``-f = -x K0/K1`` for F, which makes ``D = t - 2 f - f^2`` negative. Continuity of both velocities,
no jump of the shear stress and the capillary jump of the normal stress are then four conditions
for four constants, and the growth rate follows without solving a matrix: with ``q = m1/D``,
``r = m2/(f^2 + 2 f - t)``, ``m = m1 - m2``, m1 inside, m2 outside, ``t = (k a)^2``,

    w = (1 - t)/(2 E),   E = -m + [q r (F + f)^2 + 2 m (q F - r f) - m^2]/(q + r)

in units of gamma/a over viscosity. F and D come from a power series and f from scaled Bessel
functions, so that no long wave loses digits.
"""

from __future__ import annotations

from typing import Any, Final

import numpy as np

from dropkit.models.jet._gas_waves import outer_ratio
from dropkit.models.jet._roots import between, newton_within
from dropkit.models.jet._viscous_relation import mapped, ratio_and_slope

__all__: list[str] = []

# Up to here the power series of F is exact to rounding.
_SERIES: Final = 2.0
_BELOW: Final = 60


def growth(x: Any, inner: Any, outer: Any) -> Any:
    """w; beyond x = 1 the decay, as a negative rate."""
    return mapped(_growth, x, inner, outer)


def fastest(inner: Any, outer: Any) -> tuple[Any, Any]:
    """t and w of the fastest wave."""
    found: tuple[Any, Any] = mapped(_fastest, inner, outer)
    return found


def band(inner: Any, outer: Any, share: Any) -> tuple[Any, Any]:
    """Ends in t of the band where w keeps a share of its maximum."""
    found: tuple[Any, Any] = mapped(_band, inner, outer, share)
    return found


def _inner(t: Any) -> tuple[Any, Any, Any]:
    """F, dF/dt and D = 2 t dF/dt."""
    from scipy.special import i0e, i1e

    ratio, slope = ratio_and_slope(np.minimum(t, _SERIES))
    if np.any(t > _SERIES):
        x = t**0.5
        far = x * (i0e(x) / i1e(x))
        ratio = np.where(t > _SERIES, far, ratio)
        slope = np.where(t > _SERIES, (t + 2.0 * far - far * far) / (2.0 * t), slope)
    return ratio, slope, 2.0 * t * slope


def _resistance(t: Any, inner: Any, outer: Any) -> tuple[Any, Any]:
    """E and dE/dt."""
    big, big_t, d = _inner(t)
    f, c = outer_ratio(t)
    f_t = c / (2.0 * t)
    d_t = 1.0 + 2.0 * (1.0 - big) * big_t
    c_t = 2.0 * (f + 1.0) * f_t - 1.0
    q, r, m = inner / d, outer / c, inner - outer
    q_t, r_t = -q * d_t / d, -r * c_t / c
    both = big + f
    top = q * r * both * both + 2.0 * m * (q * big - r * f) - m * m
    top_t = (
        (q_t * r + q * r_t) * both * both
        + 2.0 * q * r * both * (big_t + f_t)
        + 2.0 * m * (q_t * big + q * big_t - r_t * f - r * f_t)
    )
    total = q + r
    return top / total - m, (top_t - top * (q_t + r_t) / total) / total


def _growth(x: Any, inner: Any, outer: Any) -> Any:
    e, _ = _resistance(x * x, inner, outer)
    return 0.5 * (1.0 - x) * (1.0 + x) / e


def _fastest(inner: Any, outer: Any) -> tuple[Any, Any]:
    def rising(logarithm: Any) -> Any:
        t = np.exp(logarithm)
        e, e_t = _resistance(t, inner, outer)
        return (e + (1.0 - t) * e_t) / e

    # With very unequal viscosities the fastest wave is long: t near the root of their ratio.
    least = 0.01 * np.minimum(inner / outer, outer / inner) ** 0.5
    t = np.exp(between(rising, np.log(least), np.zeros_like(least)))
    return t, _growth(t**0.5, inner, outer)


def _band(inner: Any, outer: Any, share: Any) -> tuple[Any, Any]:
    most, fast = _fastest(inner, outer)
    w = share * fast

    def missing(t: Any, w: Any, inner: Any, outer: Any) -> tuple[Any, Any]:
        e, e_t = _resistance(t, inner, outer)
        return 2.0 * w * e / (1.0 - t) - 1.0, 2.0 * w * (e_t + e / (1.0 - t)) / (1.0 - t)

    least = 0.5 * most
    for _ in range(_BELOW):
        short = missing(least, w, inner, outer)[0] < 0.0
        if not np.any(short):
            break
        least = np.where(short, 0.1 * least, least)
    near_end = 1.0 - 0.25 * share * (1.0 - most)
    low = newton_within(missing, 0.4 * most, least, most, w, inner, outer)
    return low, newton_within(_against_end, near_end, most, 1.0 + 0.0 * most, w, inner, outer)


def _against_end(t: Any, w: Any, inner: Any, outer: Any) -> tuple[Any, Any]:
    """The same condition for the end at the cut-off, where E is nearly constant."""
    e, e_t = _resistance(t, inner, outer)
    return 2.0 * w * e - (1.0 - t), 2.0 * w * e_t + 1.0
