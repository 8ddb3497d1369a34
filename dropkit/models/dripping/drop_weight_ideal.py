"""Ideal drop weight: the whole circumference of the tip carries the drop. Tate 1864."""

from __future__ import annotations

import math
from typing import Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["drop_diameter_ideal", "drop_mass_ideal", "drop_volume_ideal"]

MODEL: Final = Published(
    gives="weight of the drop that a tip could hold by its whole circumference",
    holds="an upper limit: real drops leave 13 to 40 % of it at the tip",
    sources=("Tate1864", "Rayleigh1899"),
    mark="C",
    place="m g = 2 pi r gamma",
    agreement="Rayleigh 1899, 7 slow water drops: 59 to 66 % of it, his own rule 3.8 r gamma is 60 %",
)


@physical(returns="volume", gravity="acceleration > 0", tip_diameter="length > 0")
def drop_volume_ideal(
    density: float, surface_tension: float, tip_diameter: float, gravity: float = 9.80665
) -> float:
    """Volume of the ideal drop from a tip, an upper limit of the real one.

    Holds as a limit for drops that form slowly; a real drop has 0.6 to 0.9 of this volume.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    tip_diameter : float or array
        Diameter of the circle that the drop hangs from [m]: the outer one of a tip that the
        liquid wets, the inner one of a tip that it does not.
    gravity : float or array
        Acceleration of gravity [m/s2].

    Returns
    -------
    float or array
        The volume [m3].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    drop_volume_tip : The volume of the drop that really falls.

    Notes
    -----
    ``V = pi d gamma/(rho g)`` [C]. Tate's finding was that the weight goes with the diameter of
    the tube; the factor pi is the naive balance, which Rayleigh called faulty.

    References
    ----------
    T. Tate, Phil. Mag. (4) 27 (1864) 176.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.drop_volume_ideal(998.2, '72.74 mN/m', '3 mm').to('uL'):.1f}")
    70.0 microliter
    """
    return math.pi * tip_diameter * surface_tension / (density * gravity)


@physical(returns="mass", gravity="acceleration > 0", tip_diameter="length > 0")
def drop_mass_ideal(surface_tension: float, tip_diameter: float, gravity: float = 9.80665) -> float:
    """Mass of the ideal drop from a tip, an upper limit of the real one.

    Holds as a limit for drops that form slowly; a real drop has 0.6 to 0.9 of this mass.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension [N/m].
    tip_diameter : float or array
        Diameter of the circle that the drop hangs from [m].
    gravity : float or array
        Acceleration of gravity [m/s2].

    Returns
    -------
    float or array
        The mass [kg].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``m = pi d gamma/g`` [C]; buoyancy in the air (0.1 % for water) left out.

    References
    ----------
    T. Tate, Phil. Mag. (4) 27 (1864) 176.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.drop_mass_ideal('72.74 mN/m', '3 mm').to('mg'):.1f}")
    69.9 milligram
    """
    return math.pi * tip_diameter * surface_tension / gravity


@physical(returns="length", gravity="acceleration > 0", tip_diameter="length > 0")
def drop_diameter_ideal(
    density: float, surface_tension: float, tip_diameter: float, gravity: float = 9.80665
) -> float:
    """Diameter of the ideal drop from a tip, an upper limit of the real one.

    Holds as a limit for drops that form slowly; a real drop has 0.84 to 0.97 of this diameter.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    tip_diameter : float or array
        Diameter of the circle that the drop hangs from [m].
    gravity : float or array
        Acceleration of gravity [m/s2].

    Returns
    -------
    float or array
        Diameter of the sphere of that volume [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``D = (6 d gamma/(rho g))^(1/3)`` [C].

    References
    ----------
    T. Tate, Phil. Mag. (4) 27 (1864) 176.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.drop_diameter_ideal(998.2, '72.74 mN/m', '3 mm').to('mm'):.2f}")
    5.11 millimeter
    """
    found: float = (6.0 * tip_diameter * surface_tension / (density * gravity)) ** (1.0 / 3.0)
    return found
