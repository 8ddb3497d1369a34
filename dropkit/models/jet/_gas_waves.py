"""Weber's equation with the pull of the gas on the crests, in reduced form.

``w^2 + 3 h t w = P(t) = (t/2) [1 - t + e f(t)]``, ``t = (k a)^2``, ``f = x K0(x)/K1(x)``, ``h`` the
Ohnesorge and ``e`` C times the gas Weber number, both on the radius.
"""

from __future__ import annotations

from typing import Any

import numpy as np

from dropkit.models.jet._roots import newton_within
from dropkit.models.jet._viscous_relation import longwave_band, mapped

__all__: list[str] = []


def outer_ratio(t: Any) -> tuple[Any, Any]:
    """f and f^2 + 2 f - t, which is 2 t df/dt."""
    from scipy.special import k0e, k1e

    x = t**0.5
    f = x * (k0e(x) / k1e(x))
    return f, f * f + 2.0 * f - t


def growth(x: Any, h: Any, e: Any) -> Any:
    """Growth rate; beyond the cut-off the decay, as a negative rate."""
    return mapped(_growth, x, h, e)


def cut_off(e: Any) -> Any:
    """x at which growth ends."""
    return mapped(lambda e: _cut_off(e) ** 0.5, e)


def fastest(h: Any, e: Any) -> tuple[Any, Any]:
    """t and w of the fastest wave."""
    found: tuple[Any, Any] = mapped(_fastest, h, e)
    return found


def band(h: Any, e: Any, share: Any) -> tuple[Any, Any]:
    """Ends in t of the band where w keeps a share of its maximum."""
    found: tuple[Any, Any] = mapped(_band, h, e, share)
    return found


def _growth(x: Any, h: Any, e: Any) -> Any:
    t = x * x
    drive = 0.5 * t * (1.0 - t + e * outer_ratio(t)[0])
    damping = 1.5 * h * t
    inner = damping * damping + drive
    root = np.sqrt(np.maximum(inner, 0.0))
    return np.where(inner < 0.0, -damping, drive / (damping + root))


def _cut_off(e: Any) -> Any:
    # f < x bounds it from above; from there Newton's steps fall on it from one side.
    t = (0.5 * (e + (e * e + 4.0) ** 0.5)) ** 2
    for _ in range(12):
        f, bend = outer_ratio(t)
        step = (1.0 - t + e * f) / (0.5 * e * bend / t - 1.0)
        t = t - step
        if not np.any(abs(step) > 1e-15 * t):
            break
    return t


def _fastest(h: Any, e: Any) -> tuple[Any, Any]:
    def falling(t: Any, h: Any, e: Any) -> tuple[Any, Any]:
        f, bend = outer_ratio(t)
        pull = 1.0 - t + e * f
        slope = pull - t + 0.5 * e * bend
        # 3 h w - dP/dt, which is -(2 w + 3 h t) dw/dt, and its derivative
        w = pull / (3.0 * h + np.sqrt(9.0 * h * h + 2.0 * np.maximum(pull, 0.0) / t))
        value = 3.0 * h * w - 0.5 * slope
        bent = 1.0 + 0.25 * e * (1.0 - (2.0 + f) * bend / t)
        return value, bent - 3.0 * h * value / (2.0 * w + 3.0 * h * t)

    # The gas favours shorter waves than Weber's.
    low, high = 1.0 / (2.0 + 3.0 * 2.0**0.5 * h), _cut_off(e)
    t = newton_within(falling, low + 0.3 * (high - 1.0), low, high, h, e)
    return t, _growth(t**0.5, h, e)


def _band(h: Any, e: Any, share: Any) -> tuple[Any, Any]:
    most, fast = _fastest(h, e)
    w = share * fast

    def missing(t: Any, w: Any, h: Any, e: Any) -> tuple[Any, Any]:
        f, bend = outer_ratio(t)
        pull = 1.0 - t + e * f
        value = w * w + 3.0 * h * w * t - 0.5 * t * pull
        return value, 3.0 * h * w - 0.5 * (pull - t + 0.5 * e * bend)

    # Left of the least t, w^2 alone is more than the drive, which is below that at the fastest.
    least = w * w / (1.0 + e * outer_ratio(most)[0])
    low, high = longwave_band(h, share)
    longwave, end = 1.0 / (2.0 + 3.0 * 2.0**0.5 * h), _cut_off(e)
    low = newton_within(missing, low * (most / longwave), least, most, w, h, e)
    high = end - (1.0 - high) * ((end - most) / (1.0 - longwave))
    return low, newton_within(missing, high, most, end, w, h, e)
