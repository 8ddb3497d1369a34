"""Speed below which waves of a viscous jet grow in place instead of being carried away.

At the threshold two waves, one downstream and one upstream of a source, meet: dOmega/dk = 0 at
Im Omega = 0 for ``Omega = k U + i w(k)``. In the units of `_complex_relation`, with ``v`` the speed:
``dw/dx = i v`` and ``v Im x + Re w = 0`` for a complex x. The saddle is solved once at the nodes of
a grid in the Ohnesorge number h; between them the speed follows by polynomials.
"""

from __future__ import annotations

from functools import cache
from typing import Any, Final

import numpy as np

from dropkit.models.jet._complex_relation import (
    V_CRITICAL,
    growth_at,
    relation,
)
from dropkit.models.jet._viscous_relation import mapped

__all__: list[str] = []

# Starts, found by following the saddle from v = 0: (1 + 3 h) x and (1 + 3 h) w at even steps of
# z = h^(1/3)/(1 + h^(1/3)) from 0 to 1.
_X: Final = (
    1.281 + 0.000j, 1.271 - 0.100j, 1.248 - 0.219j, 1.234 - 0.369j, 1.258 - 0.598j, 1.241 - 1.054j,
    0.577 - 1.280j, 0.376 - 1.040j, 0.338 - 0.960j, 0.327 - 0.932j, 0.324 - 0.923j, 0.323 - 0.921j,
    0.323 - 0.921j,
)  # fmt: skip
_W: Final = (
    0.000 + 0.664j, 0.175 + 0.643j, 0.359 + 0.576j, 0.534 + 0.461j, 0.690 + 0.302j, 0.829 + 0.069j,
    0.675 - 0.301j, 0.502 - 0.302j, 0.458 - 0.285j, 0.444 - 0.277j, 0.440 - 0.275j, 0.439 - 0.274j,
    0.438 - 0.274j,
)  # fmt: skip

_CELLS: Final = 512
_DEGREE: Final = 7
# Beyond this h the speed has reached its limit to rounding.
_THICK: Final = 1e8


def threshold_speed(h: Any) -> Any:
    """v at the threshold for any h > 0, floats or arrays, to about 1e-9 of itself."""
    return mapped(_interpolated, h)


def saddle(h: Any, x: Any, w: Any) -> tuple[Any, Any, Any]:
    """v, x and w of the threshold at each h > 0, by Newton's method from starts of x and w."""
    for _ in range(12):
        w = growth_at(x, w, h)
        slope, bend = _slope(x, w, h), 1e-4 * x
        second = (
            _slope(x + bend, growth_at(x + bend, w + slope * bend, h), h)
            - _slope(x - bend, growth_at(x - bend, w - slope * bend, h), h)
        ) / (2.0 * bend)
        first, last = slope.real, slope.imag * x.imag + w.real
        a, b = second.real, -second.imag
        c, d = second.imag * x.imag + slope.real, second.real * x.imag
        whole = a * d - b * c
        step = -(first * d - b * last) / whole - 1j * (a * last - c * first) / whole
        x = x + step
        w = w + slope * step
        if not (np.abs(step) > 1e-12 * np.abs(x)).any():
            break
    w = growth_at(x, w, h)
    return _slope(x, w, h).imag, x, w


def _slope(x: Any, w: Any, h: Any) -> Any:
    _, f_t, f_w = relation(x * x, w, h)
    return -2.0 * x * f_t / f_w


@cache
def _nodes() -> Any:
    z = np.linspace(0.0, 1.0, _CELLS + 1)[1:]
    h = np.append((z[:-1] / (1.0 - z[:-1])) ** 3, _THICK)
    coarse = np.linspace(0.0, 1.0, len(_X))
    with np.errstate(all="ignore"):
        x = np.interp(z, coarse, np.array(_X)) / (1.0 + 3.0 * h)
        w = np.interp(z, coarse, np.array(_W)) / (1.0 + 3.0 * h)
        speed, _, _ = saddle(h, x, w)
    return np.append(V_CRITICAL, speed)


def _interpolated(h: Any) -> Any:
    root = np.cbrt(h)
    place = _CELLS * (root / (1.0 + root))
    known = np.nan_to_num(place)  # what is NaN stays so through the weights
    first = np.clip(known.astype(int) - _DEGREE // 2, 0, _CELLS - _DEGREE)
    u = place - first
    nodes = _nodes()
    total: Any = 0.0
    for j in range(_DEGREE + 1):
        weight: Any = 1.0
        for m in range(_DEGREE + 1):
            if m != j:
                weight = weight * (u - m) / (j - m)
        total = total + weight * nodes[first + j]
    return total
