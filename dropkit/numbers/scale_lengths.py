"""Lengths and speeds at which two influences on a liquid balance."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = [
    "capillary_length",
    "inertio_capillary_length",
    "inertio_capillary_velocity",
    "inertio_capillary_velocity_radius",
    "visco_capillary_length",
    "visco_capillary_velocity",
    "viscous_length",
]


@physical(returns="distance", gravity="acceleration > 0")
def capillary_length(density: float, surface_tension: float, gravity: float = 9.80665) -> float:
    """Capillary length l_c: where surface tension and weight balance.

    Far smaller drops are round caps, far larger ones puddles.

    Parameters
    ----------
    density : float or array
        Density of the liquid; in another liquid, the difference of the densities [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    gravity : float or array
        Acceleration of gravity [m/s2].

    Returns
    -------
    float or array
        The length, in the broadcast shape of the arguments [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    capillary_time : The time that goes with it.

    Notes
    -----
    ``l_c = [gamma / (rho g)]^(1/2)``. The "capillary constant" of older works has a factor 2
    below the root: larger by 1.414.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.capillary_length(998.2, 0.0727), 6)
    0.002725
    """
    scale: float = (surface_tension / (density * gravity)) ** 0.5
    return scale


@physical(returns="length")
def visco_capillary_length(density: float, viscosity: float, surface_tension: float) -> float:
    """Visco-capillary length l_mu: size at which the Ohnesorge number is 1.

    A property of the liquid alone: 14 nm for water, millimetres for a thick oil.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].

    Returns
    -------
    float or array
        The length, in the broadcast shape of the arguments [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    visco_capillary_time : At this length it equals the inertio-capillary time.

    Notes
    -----
    ``l_mu = mu^2 / (rho gamma)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.visco_capillary_length(998.2, 1.0016e-3, 0.0727) * 1e9, 2)
    13.82
    """
    return viscosity * viscosity / (density * surface_tension)


@physical(returns="length", time="time >= 0")
def viscous_length(density: float, viscosity: float, time: float) -> float:
    """Viscous length l_v: how far friction has spread after a time.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    time : float or array
        Time; the period of a vibration over 2 pi gives the layer it moves, times 2^(1/2) [s].

    Returns
    -------
    float or array
        The length, in the broadcast shape of the arguments [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    viscous_time : The inverse.

    Notes
    -----
    ``l_v = (mu t / rho)^(1/2)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.viscous_length(1000.0, 1e-3, 1e-6), 12)
    1e-06
    """
    scale: float = (viscosity * time / density) ** 0.5
    return scale


@physical(returns="length", time="time >= 0")
def inertio_capillary_length(density: float, surface_tension: float, time: float) -> float:
    """Inertio-capillary length l_i: size that surface tension moves within a time.

    The neck of a thin liquid shrinks with this length as the time to pinch-off runs out.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    time : float or array
        Time [s].

    Returns
    -------
    float or array
        The length, in the broadcast shape of the arguments [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    inertio_capillary_time : The inverse.

    Notes
    -----
    ``l_i = (gamma t^2 / rho)^(1/3)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.inertio_capillary_length(1000.0, 0.064, 1e-6) * 1e6, 6)
    4.0
    """
    scale: float = (surface_tension * time * time / density) ** (1.0 / 3.0)
    return scale


@physical(returns="velocity")
def visco_capillary_velocity(viscosity: float, surface_tension: float) -> float:
    """Visco-capillary velocity U_mu: speed at which the capillary number is 1.

    A property of the liquid alone.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].

    Returns
    -------
    float or array
        The speed, in the broadcast shape of the arguments [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``U_mu = gamma / mu``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.visco_capillary_velocity(0.010, 0.030), 9)
    3.0
    """
    return surface_tension / viscosity


@physical(returns="velocity")
def inertio_capillary_velocity(density: float, surface_tension: float, length: float) -> float:
    """Inertio-capillary velocity U_i: speed at which the Weber number is 1.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the jet or drop [m].

    Returns
    -------
    float or array
        The speed, in the broadcast shape of the arguments [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    inertio_capillary_velocity_radius : On the radius, the tip speed of a retracting thread.

    Notes
    -----
    ``U_i = [gamma / (rho d)]^(1/2)``. A sheet of thickness ``h`` retracts at
    ``[2 gamma / (rho h)]^(1/2)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.inertio_capillary_velocity(1000.0, 0.030, 30e-6), 9)
    1.0
    """
    scale: float = (surface_tension / (density * length)) ** 0.5
    return scale


@physical(returns="velocity")
def inertio_capillary_velocity_radius(
    density: float, surface_tension: float, radius: float
) -> float:
    """Inertio-capillary velocity U_ia: speed at which the Weber number on the radius is 1.

    The speed at which the tip of a thread of this radius retracts.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    radius : float or array
        Radius of the thread, jet or drop [m].

    Returns
    -------
    float or array
        The speed, in the broadcast shape of the arguments [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    inertio_capillary_velocity : The same on the diameter.

    Notes
    -----
    ``U_ia = [gamma / (rho a)]^(1/2) = 2^(1/2) U_i``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.inertio_capillary_velocity_radius(998.2, 0.07275, 10e-6), 4)
    2.6997
    """
    scale: float = (surface_tension / (density * radius)) ** 0.5
    return scale
