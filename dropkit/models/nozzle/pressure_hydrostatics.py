"""Gauge and absolute pressure, and the pressure of a column of liquid."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.published import Published
from dropkit.unit_table import STANDARD_ATMOSPHERE

__all__ = ["absolute_from_gauge", "gauge_from_absolute", "gravity_head"]

GRAVITY: Final = 9.80665

MODEL: Final = Published(
    gives="pressure of a column of liquid; gauge from absolute pressure and back",
    holds="liquid at rest",
    sources=(),
    mark="C",
    place="p = rho g h",
    agreement="hydrostatics, exact",
)


@physical(returns="pressure", gravity="acceleration > 0")
def gravity_head(density: float, height: float, *, gravity: float = GRAVITY) -> float:
    """Pressure of a column of liquid.

    What a supply above the nozzle adds to the gauge pressure at the nozzle, and what one below it
    takes away.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    height : float or array
        Height of the column [m].
    gravity : float or array, keyword-only
        Acceleration by gravity [m/s2].

    Returns
    -------
    float or array
        The pressure [Pa].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``p = rho g h`` [C].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.gravity_head('998.2 kg/m3', '0.5 m'):.2f}")
    4.89 kilopascal
    """
    return density * gravity * height


@physical(returns="gauge_pressure", ambient_pressure="absolute_pressure > 0")
def gauge_from_absolute(
    absolute_pressure: float, *, ambient_pressure: float = STANDARD_ATMOSPHERE
) -> float:
    """Gauge pressure, the one that the models of this folder take, from the absolute one.

    The surroundings are what the jet leaves into: a pressurised or evacuated chamber counts.

    Parameters
    ----------
    absolute_pressure : float or array
        Pressure above vacuum [Pa].
    ambient_pressure : float or array, keyword-only
        Pressure of the surroundings of the jet above vacuum [Pa].

    Returns
    -------
    float or array
        Pressure above that of the surroundings [Pa]; negative below it.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, such as a gauge reading, or outside its domain.

    Notes
    -----
    The difference of the two [C].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.gauge_from_absolute('3 bara'):.1f}")
    198.7 kilopascal
    """
    return absolute_pressure - ambient_pressure


@physical(
    returns="absolute_pressure",
    gauge_pressure="gauge_pressure > 0",
    ambient_pressure="absolute_pressure > 0",
)
def absolute_from_gauge(
    gauge_pressure: float, *, ambient_pressure: float = STANDARD_ATMOSPHERE
) -> float:
    """Absolute pressure from the gauge pressure: inverse of `gauge_from_absolute`.

    Parameters
    ----------
    gauge_pressure : float or array
        Pressure above that of the surroundings [Pa].
    ambient_pressure : float or array, keyword-only
        Pressure of the surroundings of the jet above vacuum [Pa].

    Returns
    -------
    float or array
        Pressure above vacuum [Pa].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, such as an absolute reading, or outside its domain.

    Notes
    -----
    The sum of the two [C].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.absolute_from_gauge('2 barg'):.1f}")
    301.3 kilopascal
    """
    return gauge_pressure + ambient_pressure
