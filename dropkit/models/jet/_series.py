"""Bessel functions by power series, so that one body serves floats and arrays without scipy."""

from __future__ import annotations

import math
from typing import Any, Final

# Terms of (x/2)^2 in I0 and in 2 I1/x. For x <= 1 the tenth is below 1e-17.
_I0: Final = tuple(1.0 / math.factorial(k) ** 2 for k in reversed(range(10)))
_I1: Final = tuple(1.0 / (math.factorial(k) * math.factorial(k + 1)) for k in reversed(range(10)))


def bessel_ratio(x: Any) -> Any:
    """I1(x)/I0(x) for 0 <= x <= 1, to rounding."""
    t = 0.25 * x * x
    numerator, denominator = _I1[0], _I0[0]
    for first, zeroth in zip(_I1[1:], _I0[1:], strict=True):
        numerator = numerator * t + first
        denominator = denominator * t + zeroth
    return 0.5 * x * numerator / denominator
