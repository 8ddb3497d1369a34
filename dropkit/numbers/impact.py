"""Numbers of drops that hit a surface."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = ["splash_parameter"]


@physical(returns="ratio", velocity="velocity >= 0")
def splash_parameter(
    density: float, viscosity: float, surface_tension: float, velocity: float, length: float
) -> float:
    """Splash parameter K: inertia of the impact against surface tension and viscosity together.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    velocity : float or array
        Speed of the impact, the part normal to the surface [m/s].
    length : float or array
        Diameter of the drop before the impact [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``K = We^(1/2) Re^(1/4) = Oh Re^(5/4)``, all on the diameter. Some papers quote the square,
    ``K^2 = We Re^(1/2)``: a limit of 57.7 on K is one of 3330 on K^2.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.splash_parameter(1000.0, "10 mPa*s", "30 mN/m", "6 m/s", "30 um"), 8)
    12.35860286
    """
    inertia = density * velocity * length
    number: float = (inertia * velocity / surface_tension) ** 0.5 * (inertia / viscosity) ** 0.25
    return number
