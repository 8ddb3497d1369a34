"""Times in which surface tension, inertia, viscosity and weight act on a liquid."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = [
    "capillary_time",
    "inertio_capillary_time",
    "inertio_capillary_time_radius",
    "visco_capillary_time",
    "visco_capillary_time_radius",
    "viscous_time",
    "viscous_time_radius",
]


@physical(returns="time", gravity="acceleration > 0")
def capillary_time(density: float, surface_tension: float, gravity: float = 9.80665) -> float:
    """Capillary time t_c: of a free fall over the capillary length.

    Contains weight; what others call the capillary time of a drop is `inertio_capillary_time`.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    gravity : float or array
        Acceleration of gravity [m/s2].

    Returns
    -------
    float or array
        The time, in the broadcast shape of the arguments [s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    capillary_length : The length that goes with it.

    Notes
    -----
    ``t_c = (l_c / g)^(1/2) = [gamma / (rho g^3)]^(1/4)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.capillary_time(998.2, 0.0727), 5)
    0.01667
    """
    scale: float = (surface_tension / (density * gravity * gravity * gravity)) ** 0.25
    return scale


@physical(returns="time")
def viscous_time(density: float, viscosity: float, length: float) -> float:
    """Viscous time t_v: for friction to spread across a jet or drop.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    length : float or array
        Diameter of the jet or drop [m].

    Returns
    -------
    float or array
        The time, in the broadcast shape of the arguments [s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    viscous_time_radius : A quarter of this, on the radius.

    Notes
    -----
    ``t_v = rho d^2 / mu``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.viscous_time(1000.0, 1e-3, "1 mm").to("s").magnitude, 9)
    1.0
    """
    return density * length * length / viscosity


@physical(returns="time")
def viscous_time_radius(density: float, viscosity: float, radius: float) -> float:
    """Viscous time t_va: for friction to spread across a jet or drop, on the radius.

    A quarter of the time on the diameter.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    radius : float or array
        Radius of the jet or drop [m].

    Returns
    -------
    float or array
        The time, in the broadcast shape of the arguments [s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    viscous_time : On the diameter.

    Notes
    -----
    ``t_va = rho a^2 / mu = t_v / 4``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.viscous_time_radius(1000.0, 1e-3, 0.5e-3), 9)
    0.25
    """
    return density * radius * radius / viscosity


@physical(returns="time")
def inertio_capillary_time(density: float, surface_tension: float, length: float) -> float:
    """Inertio-capillary time t_i: for surface tension to move the liquid of a jet or drop.

    Rayleigh's time, the unit of breakup and oscillation of thin liquids.

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
        The time, in the broadcast shape of the arguments [s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    inertio_capillary_time_radius : On the radius, smaller by 2.83; growth rates of jets and the
        Deborah number are written in that one.

    Notes
    -----
    ``t_i = (rho d^3 / gamma)^(1/2)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.inertio_capillary_time(1000.0, 0.064, 40e-6) * 1e6, 3)
    31.623
    """
    scale: float = (density * length * length * length / surface_tension) ** 0.5
    return scale


@physical(returns="time")
def inertio_capillary_time_radius(density: float, surface_tension: float, radius: float) -> float:
    """Inertio-capillary time t_ia: for surface tension to move the liquid, on the radius.

    The time in which growth rates of jets, Rayleigh's drop oscillation and the Deborah number
    are written.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    radius : float or array
        Radius of the jet or drop [m].

    Returns
    -------
    float or array
        The time, in the broadcast shape of the arguments [s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    inertio_capillary_time : On the diameter.

    Notes
    -----
    ``t_ia = (rho a^3 / gamma)^(1/2) = t_i / 8^(1/2)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.inertio_capillary_time_radius(998.2, 0.07275, 1e-3) * 1e3, 4)
    3.7042
    """
    scale: float = (density * radius * radius * radius / surface_tension) ** 0.5
    return scale


@physical(returns="time")
def visco_capillary_time(viscosity: float, surface_tension: float, length: float) -> float:
    """Visco-capillary time t_mu: for surface tension to pinch a thread against viscosity.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the jet, drop or thread [m].

    Returns
    -------
    float or array
        The time, in the broadcast shape of the arguments [s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    visco_capillary_time_radius : Half of this, on the radius.

    Notes
    -----
    ``t_mu = mu d / gamma``. A Newtonian thread thins at ``dD/dt = -0.1418 gamma / mu``, so that
    one of diameter ``d`` lasts ``7.05 t_mu``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.visco_capillary_time(1.0, 0.03, 30e-6) * 1e3, 6)
    1.0
    """
    return viscosity * length / surface_tension


@physical(returns="time")
def visco_capillary_time_radius(viscosity: float, surface_tension: float, radius: float) -> float:
    """Visco-capillary time t_mua: for surface tension to pinch against viscosity, on the radius.

    Half of the time on the diameter.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    radius : float or array
        Radius of the jet, drop or thread [m].

    Returns
    -------
    float or array
        The time, in the broadcast shape of the arguments [s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    visco_capillary_time : On the diameter.

    Notes
    -----
    ``t_mua = mu a / gamma = t_mu / 2``. A thread thins at ``dR/dt = -0.0709 gamma / mu``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.visco_capillary_time_radius(1.0, 0.03, 15e-6) * 1e3, 6)
    0.5
    """
    return viscosity * radius / surface_tension
