"""Speed and diameter of a jet that falls freely: gravity thins it."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["jet_diameter_free_fall", "jet_velocity_free_fall"]

MODEL: Final = Published(
    gives="speed and diameter of a falling jet at a distance below the nozzle",
    holds="a jet straight downwards, free fall: no drag of air, no pull of viscosity (distance well "
    "above (nu^2/g)^(1/3)) or of surface tension",
    sources=(),
    mark="C",
    place="U^2 = U0^2 + 2 g z, d = d0 (1 + 2 g z/U0^2)^(-1/4)",
    agreement="conservation of energy and volume; no measured profiles were seen",
)


@physical(returns="velocity", velocity="velocity > 0", gravity="acceleration >= 0")
def jet_velocity_free_fall(velocity: float, distance: float, *, gravity: float = 9.80665) -> float:
    """Speed of a jet that has fallen freely for a distance.

    Holds straight downwards, without drag of the air.

    Parameters
    ----------
    velocity : float or array
        Speed of the jet at the nozzle [m/s].
    distance : float or array
        Distance below the nozzle [m].
    gravity : float or array, keyword-only
        Acceleration along the jet [m/s2]; 9.80665 by default.

    Returns
    -------
    float or array
        The speed [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``U^2 = U0^2 + 2 g z`` [C].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.jet_velocity_free_fall('1 m/s', '100 mm'):.2f}")
    1.72 meter / second
    """
    squared: Any = velocity * velocity + 2.0 * gravity * distance
    result: float = squared**0.5
    return result


@physical(returns="length", velocity="velocity > 0", gravity="acceleration >= 0")
def jet_diameter_free_fall(
    velocity: float, jet_diameter: float, distance: float, *, gravity: float = 9.80665
) -> float:
    """Diameter of a jet that has fallen freely for a distance.

    Holds straight downwards, without drag of the air, where viscosity doesn't hold the jet up.

    Parameters
    ----------
    velocity : float or array
        Speed of the jet at the nozzle [m/s].
    jet_diameter : float or array
        Diameter of the jet at the nozzle [m].
    distance : float or array
        Distance below the nozzle [m].
    gravity : float or array, keyword-only
        Acceleration along the jet [m/s2]; 9.80665 by default.

    Returns
    -------
    float or array
        The diameter there [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``d = d0 (1 + 2 g z/U0^2)^(-1/4)`` [C]: the flow stays the same.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.jet_diameter_free_fall('1 m/s', '1 mm', '100 mm'):.0f}")
    762 micrometer
    """
    grown: Any = 1.0 + 2.0 * gravity * distance / (velocity * velocity)
    result: float = jet_diameter * grown**-0.25
    return result
