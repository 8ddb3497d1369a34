"""Drops from flow and drive frequency: one drop per period, all of the liquid."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["drop_diameter_from_flow", "flow_from_drop", "frequency_from_drop"]

MODEL: Final = Published(
    gives="diameter of drops made one per period",
    holds="a jet that breaks up once per period, without satellites that stay apart",
    sources=(),
    mark="C",
    place="D = (6 Q/(pi f))^(1/3)",
    agreement="conservation of volume; exact where the drive rules the breakup",
)


@physical(returns="length")
def drop_diameter_from_flow(flow: float, frequency: float) -> float:
    """Diameter of the drops when each period of the drive makes one drop.

    Holds where the drive rules the breakup: no merging, no satellite that stays apart.

    Parameters
    ----------
    flow : float or array
        Volume flow of one jet [m3/s].
    frequency : float or array
        Drive frequency [Hz].

    Returns
    -------
    float or array
        Drop diameter [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``D = (6 Q/(pi f))^(1/3)`` [C]: conservation of volume.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.drop_diameter_from_flow('1 mL/min', '10 kHz'):.1f}")
    147.1 micrometer
    """
    cube: Any = 6.0 * flow / (math.pi * frequency)
    result: float = cube ** (1.0 / 3.0)
    return result


@physical(returns="flow")
def flow_from_drop(drop_diameter: float, frequency: float) -> float:
    """Volume flow of one jet that makes drops of a given size at a given rate.

    The inverse of `drop_diameter_from_flow`.

    Parameters
    ----------
    drop_diameter : float or array
        Drop diameter [m].
    frequency : float or array
        Drops per second, which is the drive frequency [Hz].

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
    ``Q = pi D^3 f/6`` [C]: conservation of volume.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.flow_from_drop('110 um', '64 kHz'):.3f}")
    2.676 milliliter / minute
    """
    return math.pi / 6.0 * drop_diameter**3 * frequency


@physical(returns="frequency")
def frequency_from_drop(flow: float, drop_diameter: float) -> float:
    """Drive frequency at which a given flow makes drops of a given size.

    The inverse of `drop_diameter_from_flow`. Whether the jet follows that frequency is another
    question: compare it with the cut-off and with the most unstable wavelength.

    Parameters
    ----------
    flow : float or array
        Volume flow of one jet [m3/s].
    drop_diameter : float or array
        Drop diameter [m].

    Returns
    -------
    float or array
        Drive frequency [Hz].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``f = 6 Q/(pi D^3)`` [C]: conservation of volume.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.frequency_from_drop('1 mL/min', '147.1 um'):.2f}")
    10.00 kilohertz
    """
    return 6.0 / math.pi * flow / drop_diameter**3
