"""How often a drop falls at a flow, and what flow still counts as slow: conservation of volume."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["drip_flow", "drip_frequency", "drip_interval", "slow_drip_flow"]

MODEL: Final = Published(
    gives="how often a drop falls, from flow and drop volume, and back",
    holds="one drop at a time, all alike; satellites counted into their drop",
    sources=("HarkinsBrown1919", "Tate1864"),
    mark="C",
    place="f = Q/V",
    agreement="conservation of volume, exact; close to the flow where a jet forms, drops come in two or "
    "more sizes",
)


@physical(returns="frequency")
def drip_frequency(flow: float, volume: float) -> float:
    """Drops per second from a flow.

    Holds while every drop is like the one before.

    Parameters
    ----------
    flow : float or array
        Volume flow of one tip [m3/s].
    volume : float or array
        Volume of a drop, its satellite with it [m3].

    Returns
    -------
    float or array
        Drops per second [Hz].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``f = Q/V`` [C].

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.drip_frequency('3 mL/min', '47.5 uL').to('Hz'):.2f}")
    1.05 hertz
    """
    return flow / volume


@physical(returns="flow")
def drip_flow(volume: float, frequency: float) -> float:
    """Flow that gives a wanted number of drops per second.

    The inverse of `drip_frequency`.

    Parameters
    ----------
    volume : float or array
        Volume of a drop, its satellite with it [m3].
    frequency : float or array
        Drops per second [Hz].

    Returns
    -------
    float or array
        Volume flow of one tip [m3/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Q = V f`` [C].

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.drip_flow('47.5 uL', '1 Hz'):.2f}")
    2.85 milliliter / minute
    """
    return volume * frequency


@physical(returns="duration")
def drip_interval(flow: float, volume: float) -> float:
    """Time from one drop to the next.

    Holds while every drop is like the one before.

    Parameters
    ----------
    flow : float or array
        Volume flow of one tip [m3/s].
    volume : float or array
        Volume of a drop, its satellite with it [m3].

    Returns
    -------
    float or array
        The time [s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``t = V/Q`` [C].

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.drip_interval('3 mL/min', '47.5 uL'):.2f}")
    0.95 second
    """
    return volume / flow


@physical(returns="flow", formation_time="duration > 0")
def slow_drip_flow(volume: float, formation_time: float = 60.0) -> float:
    """Flow up to which dripping counts as slow, so that the drop weight tables hold.

    Holds for thin liquids. At a drop per second water, ethanol and ether drops of a 3 mm tip are
    5 to 12 % heavier than slow ones.

    Parameters
    ----------
    volume : float or array
        Volume of a drop [m3].
    formation_time : float or array
        Time that a drop must take [s]: a minute for 1 %. Tate took never less than 40 s.

    Returns
    -------
    float or array
        Volume flow of one tip [m3/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Q = V/t``. The minute is remembered as Harkins & Brown's [M]; Tate's 40 s were seen in
    Rayleigh's account [S].

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.slow_drip_flow('47.5 uL').to('uL/min'):.1f}")
    47.5 microliter / minute
    """
    return volume / formation_time
