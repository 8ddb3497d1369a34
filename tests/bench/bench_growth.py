"""What a user would write for the full viscous relation: the printed form with a root finder.

The form is that of Rayleigh and Chandrasekhar with scaled Bessel functions, so that it holds for thin
liquids too. `scalar_roots` calls scipy's scalar root finder point by point between 0 and the inviscid
growth; `newton` steps all points at once, from Weber's root, with the derivative by a difference.
"""

from __future__ import annotations

from typing import Any

import numpy as np
from scipy.optimize import brentq
from scipy.special import i0e, i1e


def points(count: int) -> tuple[Any, Any]:
    """Reduced wavenumbers and Ohnesorge numbers on the radius, 1e-3 to 10, always the same."""
    rng = np.random.default_rng(2024)
    return rng.uniform(0.02, 0.98, count), 10.0 ** rng.uniform(-3, 1, count)


def mismatch(w: Any, x: Any, oh: Any) -> Any:
    """Left minus right side as printed, lengths in radii, times in sqrt(rho a^3/gamma)."""
    y = np.sqrt(x * x + w / oh)
    ratio, there = i1e(x) / i0e(x), i0e(y) / i1e(y)
    bracket = (1.0 - ratio / x) - (2.0 * x * y / (x * x + y * y)) * ratio * (there - 1.0 / y)
    pull = x * (1.0 - x * x) * ratio * (y * y - x * x) / (y * y + x * x)
    return w * w + 2.0 * oh * x * x * bracket * w - pull


def scalar_roots(x: Any, oh: Any) -> Any:
    """Point by point; w = 0 solves the printed form too, so the search begins above it."""
    found = []
    for one, thick in zip(x.tolist(), oh.tolist(), strict=True):
        top = (one * (1.0 - one * one) * i1e(one) / i0e(one)) ** 0.5
        damping = 3.0 * thick * one * one
        least = 0.5 * (top * top) / (damping + top)
        found.append(brentq(mismatch, least, top, (one, thick), xtol=1e-14, rtol=1e-13))
    return np.array(found)


def newton(x: Any, oh: Any) -> Any:
    """All at once, six steps."""
    damping = 1.5 * oh * x * x
    drive = 0.5 * x * x * (1.0 - x * x)
    w = drive / (damping + np.sqrt(damping * damping + drive))
    for _ in range(6):
        step = 1e-6 * w
        here = mismatch(w, x, oh)
        w = w - here * step / (mismatch(w + step, x, oh) - here)
    return w
