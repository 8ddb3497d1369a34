"""Numbers that compare viscosity with surface tension, with and without inertia."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = ["capillary", "laplace", "laplace_radius", "ohnesorge", "ohnesorge_radius", "z_number"]


@physical(returns="ratio")
def ohnesorge(density: float, viscosity: float, surface_tension: float, length: float) -> float:
    """Ohnesorge number Oh: viscosity against inertia and surface tension together.

    Contains no speed: it belongs to a liquid and a size.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the jet, drop or nozzle [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    ohnesorge_radius : The number on the radius, larger by the square root of 2.
    z_number : One over this.
    laplace : One over the square of this.

    Notes
    -----
    ``Oh = mu / (rho gamma d)^(1/2) = We^(1/2) / Re``. Weber's factor ``1 + 3 Oh`` for the
    most unstable wavelength takes this form, on the diameter; with the number on the radius
    it is ``1 + (3 / 2^(1/2)) Oh_a``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.ohnesorge(1000.0, "10 mPa*s", "30 mN/m", "25 um"), 10)
    0.3651483717
    """
    number: float = viscosity / (density * surface_tension * length) ** 0.5
    return number


@physical(returns="ratio")
def ohnesorge_radius(
    density: float, viscosity: float, surface_tension: float, radius: float
) -> float:
    """Ohnesorge number Oh_a: viscosity against inertia and surface tension, on the radius.

    Larger by the square root of 2 than the number on the diameter; theory of jets uses it.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    radius : float or array
        Radius of the jet, drop or nozzle [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    ohnesorge : The number on the diameter.

    Notes
    -----
    ``Oh_a = mu / (rho gamma a)^(1/2) = 2^(1/2) Oh``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.ohnesorge_radius(1000.0, "10 mPa*s", "30 mN/m", "12.5 um"), 6)
    0.516398
    """
    number: float = viscosity / (density * surface_tension * radius) ** 0.5
    return number


@physical(returns="ratio")
def z_number(density: float, viscosity: float, surface_tension: float, length: float) -> float:
    """Z number Z: inertia and surface tension together against viscosity.

    One over the Ohnesorge number, on the diameter of the nozzle: how the drop-on-demand trade
    quotes it. It says nothing about speed: a liquid inside a Z window may still fail to leave
    the nozzle, or splash.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid at the shear rate in the nozzle [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the nozzle [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    ohnesorge : One over this.

    Notes
    -----
    ``Z = (rho gamma d)^(1/2) / mu``. Some papers use the radius of the nozzle: their Z is
    smaller by the square root of 2.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.z_number(1000.0, "10 mPa*s", "30 mN/m", "25 um"), 9)
    2.738612788
    """
    number: float = (density * surface_tension * length) ** 0.5 / viscosity
    return number


@physical(returns="ratio")
def laplace(density: float, viscosity: float, surface_tension: float, length: float) -> float:
    """Laplace number La: surface tension against viscosity, weighted by inertia.

    Also called the Suratman number.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the jet, drop or nozzle [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    ohnesorge : ``La = 1 / Oh^2``.

    Notes
    -----
    ``La = rho gamma d / mu^2``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.laplace(1000.0, 1e-3, 0.1, 1e-4), 6)
    10000.0
    """
    return density * surface_tension * length / (viscosity * viscosity)


@physical(returns="ratio")
def laplace_radius(
    density: float, viscosity: float, surface_tension: float, radius: float
) -> float:
    """Laplace number La_a: surface tension against viscosity, weighted by inertia, on the radius.

    Half of the number on the diameter.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    radius : float or array
        Radius of the jet, drop or nozzle [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    laplace : The number on the diameter.

    Notes
    -----
    ``La_a = rho gamma a / mu^2 = La / 2``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.laplace_radius(1000.0, 1e-3, 0.1, 5e-5), 6)
    5000.0
    """
    return density * surface_tension * radius / (viscosity * viscosity)


@physical(returns="ratio", velocity="velocity >= 0")
def capillary(viscosity: float, surface_tension: float, velocity: float) -> float:
    """Capillary number Ca: viscosity against surface tension.

    Contains no length: it belongs to a liquid and a speed.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the liquid that does the shearing [Pa*s].
    surface_tension : float or array
        Surface tension, or interfacial tension between two liquids [N/m].
    velocity : float or array
        Speed [m/s].

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
    ``Ca = mu U / gamma = We / Re``. For drops in another liquid the viscosity is that of the
    outer one, as a rule.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.capillary(0.01, 0.1, 1.2), 12)
    0.12
    """
    return viscosity * velocity / surface_tension
