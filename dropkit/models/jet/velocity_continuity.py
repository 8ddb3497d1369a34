"""Speed of a jet from its flow: conservation of volume."""

from __future__ import annotations

import math
from typing import Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["jet_flow", "jet_velocity"]

MODEL: Final = Published(
    gives="mean speed of a jet from its flow and diameter, and back",
    holds="a round jet; the diameter is that of the section where the speed is wanted",
    sources=(),
    mark="C",
    place="U = 4 Q/(pi d^2)",
    agreement="conservation of volume, exact",
)


@physical(returns="velocity")
def jet_velocity(flow: float, jet_diameter: float) -> float:
    """Mean speed of a round jet from its volume flow.

    Parameters
    ----------
    flow : float or array
        Volume flow of one jet [m3/s].
    jet_diameter : float or array
        Diameter of the jet where the speed is wanted [m].

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
    ``U = 4 Q/(pi d^2)`` [C]. With the nozzle's diameter instead it is the mean speed inside.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.jet_velocity('2.68 mL/min', '60 um'):.1f}")
    15.8 meter / second
    """
    return 4.0 / math.pi * flow / (jet_diameter * jet_diameter)


@physical(returns="flow", velocity="velocity > 0")
def jet_flow(velocity: float, jet_diameter: float) -> float:
    """Volume flow of a round jet from its mean speed.

    The inverse of `jet_velocity`.

    Parameters
    ----------
    velocity : float or array
        Mean speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet where it has that speed [m].

    Returns
    -------
    float or array
        Volume flow [m3/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Q = pi d^2 U/4`` [C].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.jet_flow('15.8 m/s', '60 um'):.2f}")
    2.68 milliliter / minute
    """
    return math.pi / 4.0 * jet_diameter * jet_diameter * velocity
