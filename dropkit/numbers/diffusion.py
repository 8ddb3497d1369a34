"""Numbers that compare the ways in which momentum, heat and matter spread."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = [
    "fourier",
    "fourier_mass",
    "lewis",
    "peclet",
    "peclet_evaporation",
    "peclet_heat",
    "prandtl",
    "schmidt",
]


@physical(returns="ratio")
def prandtl(viscosity: float, heat_capacity: float, thermal_conductivity: float) -> float:
    """Prandtl number Pr: spreading of momentum against spreading of heat.

    A property of the fluid alone; liquid or gas, all three arguments of the same one.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    heat_capacity : float or array
        Heat capacity at constant pressure [J/(kg*K)].
    thermal_conductivity : float or array
        Thermal conductivity [W/(m*K)].

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
    ``Pr = c_p mu / k``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.prandtl(4.61e-6, 1637.0, 0.010), 6)
    0.754657
    """
    return heat_capacity * viscosity / thermal_conductivity


@physical(returns="ratio")
def schmidt(density: float, viscosity: float, diffusivity: float) -> float:
    """Schmidt number Sc: spreading of momentum against spreading of matter.

    Liquid or gas, all three arguments of the same fluid.

    Parameters
    ----------
    density : float or array
        Density of the fluid in which matter spreads [kg/m3].
    viscosity : float or array
        Dynamic viscosity of that fluid [Pa*s].
    diffusivity : float or array
        Diffusivity of the matter in that fluid [m2/s].

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
    ``Sc = mu / (rho D)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.schmidt(800.0, 4.61e-6, 2e-6), 8)
    0.00288125
    """
    return viscosity / (density * diffusivity)


@physical(returns="ratio")
def lewis(
    density: float, heat_capacity: float, thermal_conductivity: float, diffusivity: float
) -> float:
    """Lewis number Le: spreading of heat against spreading of matter.

    Liquid or gas, all four arguments of the same fluid.

    Parameters
    ----------
    density : float or array
        Density [kg/m3].
    heat_capacity : float or array
        Heat capacity at constant pressure [J/(kg*K)].
    thermal_conductivity : float or array
        Thermal conductivity [W/(m*K)].
    diffusivity : float or array
        Diffusivity of the matter [m2/s].

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
    ``Le = k / (rho c_p D) = Sc / Pr``. Some authors, combustion among them, print the inverse.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.lewis(800.0, 2200.0, 0.2, 22.6e-6), 10)
    0.0050281577
    """
    return thermal_conductivity / (density * heat_capacity * diffusivity)


@physical(returns="ratio", velocity="velocity >= 0")
def peclet(diffusivity: float, velocity: float, length: float) -> float:
    """Peclet number Pe: transport by flow against diffusion.

    Parameters
    ----------
    diffusivity : float or array
        Diffusivity of the matter [m2/s].
    velocity : float or array
        Speed [m/s].
    length : float or array
        Diameter of the jet, drop or channel [m].

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
    peclet_heat : The same for heat.
    peclet_evaporation : The number of a drying drop.

    Notes
    -----
    ``Pe = U d / D = Re Sc``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.peclet(1e-9, "1 mm/s", "100 um"), 6)
    100.0
    """
    return velocity * length / diffusivity


@physical(returns="ratio", velocity="velocity >= 0")
def peclet_heat(
    density: float,
    heat_capacity: float,
    thermal_conductivity: float,
    velocity: float,
    length: float,
) -> float:
    """Peclet number of heat Pe_h: transport of heat by flow against conduction.

    Parameters
    ----------
    density : float or array
        Density of the fluid that flows [kg/m3].
    heat_capacity : float or array
        Its heat capacity at constant pressure [J/(kg*K)].
    thermal_conductivity : float or array
        Its thermal conductivity [W/(m*K)].
    velocity : float or array
        Speed [m/s].
    length : float or array
        Diameter of the jet, drop or channel [m].

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
    peclet : The same for matter.

    Notes
    -----
    ``Pe_h = rho c_p U d / k = Re Pr``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.peclet_heat(1000.0, 4000.0, 0.6, 1.5, 2.0), 3)
    20000000.0
    """
    return density * heat_capacity * velocity * length / thermal_conductivity


@physical(returns="ratio", evaporation_constant="diffusivity >= 0")
def peclet_evaporation(diffusivity: float, evaporation_constant: float) -> float:
    """Peclet number of drying Pe_e: retreat of the drop's surface against diffusion inside.

    Above about 1 what is dissolved or dispersed piles up at the surface.

    Parameters
    ----------
    diffusivity : float or array
        Diffusivity of the solute or particle inside the drop [m2/s].
    evaporation_constant : float or array
        ``K`` of the law ``d^2 = d0^2 - K t``, on the DIAMETER [m2/s].

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
    peclet : The number of a flow.

    Notes
    -----
    ``Pe_e = K / (8 D)``: the radius times the speed of the surface over the diffusivity. With the
    constant on the radius, ``a^2 = a0^2 - K' t``, ``K = 4 K'``, it is ``K' / (2 D)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.peclet_evaporation(1e-10, "587.3 um^2/s"), 4)
    0.7341
    """
    return evaporation_constant / (8.0 * diffusivity)


@physical(returns="ratio", time="time >= 0")
def fourier(
    density: float, heat_capacity: float, thermal_conductivity: float, length: float, time: float
) -> float:
    """Fourier number Fo: time against the time for heat to cross the body.

    Parameters
    ----------
    density : float or array
        Density of the body [kg/m3].
    heat_capacity : float or array
        Its heat capacity [J/(kg*K)].
    thermal_conductivity : float or array
        Its thermal conductivity [W/(m*K)].
    length : float or array
        Diameter of the drop or jet; books on cooling of spheres use the radius: 4 times [m].
    time : float or array
        Time [s].

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
    fourier_mass : The same for matter.

    Notes
    -----
    ``Fo = k t / (rho c_p d^2)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.fourier(1000.0, 4000.0, 0.6, 2.0, 1.5) * 1e8, 9)
    5.625
    """
    return thermal_conductivity * time / (density * heat_capacity * length * length)


@physical(returns="ratio", time="time >= 0")
def fourier_mass(diffusivity: float, length: float, time: float) -> float:
    """Fourier number of matter Fo_m: time against the time for matter to cross the body.

    Parameters
    ----------
    diffusivity : float or array
        Diffusivity of the matter in the body [m2/s].
    length : float or array
        Diameter of the drop or jet [m].
    time : float or array
        Time [s].

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
    fourier : The same for heat.

    Notes
    -----
    ``Fo_m = D t / d^2``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.fourier_mass(1e-9, 2.0, 1.5) * 1e10, 9)
    3.75
    """
    return diffusivity * time / (length * length)
