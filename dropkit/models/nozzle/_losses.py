"""What the models of this folder share: the parts of a pressure, and the root of a loss law."""

from __future__ import annotations

import math
from collections.abc import Callable
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.validity import Range

# Pressures below which no jet leaves the hole: surface tension alone holds the liquid back.
DRIVING: Final = Range(1.0, math.inf, "the pressure over the capillary pressure of the jet", "")

# Laminar below 2100, turbulent above 4000, as engineering pages quote it [S2].
LAMINAR: Final = Range(0.0, 2100.0, "the Reynolds number of the hole", "")

PARTS: Final = ("gauge_pressure", "pressure", "pressure", "pressure", "pressure")

# Rounding in a ratio of lengths must not put the end of a range outside it.
ROUNDING: Final = 1e-6

# Half of Sampson's exact resistance of a thin plate, 3 mu Q/a^3 for both sides: a jet in gas has
# viscous liquid on one side only. In terms of mean speed and diameter: 3 pi mu U/d [C].
ENTRY: Final = 3.0 * math.pi
POISEUILLE: Final = 32.0

_STEP: Final = 1e-15  # where Newton ends: the noise of a logarithm


class NozzlePressure(NamedTuple):
    """The pressure that a flow needs, in its parts.

    Parameters
    ----------
    total : float, array or Quantity
        Gauge pressure ahead of the nozzle, the sum of the others [Pa].
    kinetic : float, array or Quantity
        What becomes kinetic energy of the liquid that leaves [Pa].
    entry : float, array or Quantity
        What is lost at the entry [Pa].
    viscous : float, array or Quantity
        What friction along the hole takes [Pa].
    capillary : float, array or Quantity
        The pressure inside the jet, surface tension over its radius [Pa].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> parts = nozzle.pressure_laminar_tube(998.2, 1e-3, 0.0727, 2e-9, 50e-6, 500e-6)
    >>> parts.total == sum(parts[1:])
    True
    """

    total: Any
    kinetic: Any
    entry: Any
    viscous: Any
    capillary: Any


def nozzle_pressure(
    kinetic: Any, entry: Any, viscous: Any, capillary: Any, mask: Any, blank: Any
) -> NozzlePressure:
    """The parts with their sum, each NaN where the range policy or any input says so."""
    # Adding nothing of the others carries their shape and NaN into every part.
    nothing = 0.0 * kinetic + 0.0 * entry + 0.0 * viscous + 0.0 * capillary
    parts = [blank(part + nothing, mask) for part in (kinetic, entry, viscous, capillary)]
    return NozzlePressure(parts[0] + parts[1] + parts[2] + parts[3], *parts)


def mean_velocity(flow: Any, diameter: Any) -> Any:
    """Mean speed in a round hole."""
    return 4.0 / math.pi * flow / (diameter * diameter)


def volume_flow(velocity: Any, diameter: Any) -> Any:
    """Flow through a round hole from the mean speed in it."""
    return math.pi / 4.0 * diameter * diameter * velocity


def capillary_pressure(surface_tension: Any, diameter: Any, contraction: Any) -> Any:
    """Surface tension over the radius of the jet."""
    return 2.0 * surface_tension / (contraction * diameter)


def driving_pressure(gauge_pressure: Any, capillary: Any) -> Any:
    """What is left to move the liquid; NaN where surface tension holds it back."""
    left = gauge_pressure - capillary
    if isinstance(left, np.ndarray):
        return np.where(left > 0.0, left, np.nan)
    return left if left > 0.0 else math.nan


def quadratic_velocity(inertial: Any, linear: Any, pressure: Any) -> Any:
    """The speed at which ``inertial U^2 + linear U`` is the pressure, without lost digits."""
    return 2.0 * pressure / (linear + (linear * linear + 4.0 * inertial * pressure) ** 0.5)


def increasing_root(function: Callable[[Any], tuple[Any, Any]], start: Any) -> Any:
    """Where an increasing function is zero: Newton inside a bracket, all elements at once.

    Parameters
    ----------
    function : callable
        Gives value and slope at each element.
    start : float or array
        First guess; the root lies within 60 of it.

    Returns
    -------
    float or array
        The root; NaN where the function is.
    """
    # What the function brings along may be an array where the start is none.
    first = function(start)[0]
    if not isinstance(first, np.ndarray):
        return _single_root(function, float(start))
    y: Any = np.broadcast_to(start, first.shape)
    with np.errstate(all="ignore"):
        low, high = y - 60.0, y + 60.0
        for _ in range(100):
            value, slope = function(y)
            low = np.where(value < 0.0, y, low)
            high = np.where(value > 0.0, y, high)
            following = y - value / slope
            inside = (following >= low) & (following <= high)
            following = np.where(inside, following, 0.5 * (low + high))
            # A NaN is no step: it stays what it is.
            moved = np.abs(following - y) > _STEP * np.maximum(1.0, np.abs(y))
            y = np.where(np.isfinite(value), following, np.nan)
            if not moved.any():
                break
    return y


def _single_root(function: Callable[[Any], tuple[Any, Any]], y: float) -> float:
    """`increasing_root` of one element: the same steps without what arrays cost."""
    low, high = y - 60.0, y + 60.0
    for _ in range(100):
        value, slope = function(y)
        if not math.isfinite(value):
            return math.nan
        low, high = (y if value < 0.0 else low), (y if value > 0.0 else high)
        following = y - value / slope
        if not low <= following <= high:
            following = 0.5 * (low + high)
        moved = abs(following - y) > _STEP * max(1.0, abs(y))
        y = following
        if not moved:
            break
    return y


def logarithm(value: Any) -> Any:
    """Natural logarithm of floats and arrays alike; NaN where there is none."""
    if isinstance(value, np.ndarray):
        with np.errstate(all="ignore"):
            return np.log(value)
    return math.log(value) if 0.0 < value < math.inf else math.nan


def exponential(value: Any) -> Any:
    """Inverse of `logarithm`."""
    if isinstance(value, np.ndarray):
        with np.errstate(all="ignore"):
            return np.exp(value)
    return math.exp(value) if value < 700.0 else math.inf if value >= 700.0 else math.nan
