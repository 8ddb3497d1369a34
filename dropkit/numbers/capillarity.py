"""Numbers that compare surface tension with inertia, of the liquid or of the gas around it."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = ["gas_weber", "gas_weber_radius", "weber", "weber_radius"]


@physical(returns="ratio", velocity="velocity >= 0")
def weber(density: float, surface_tension: float, velocity: float, length: float) -> float:
    """Weber number We: inertia of the liquid against surface tension.

    The number of dripping, jetting, breakup lengths and impact; what a gas does to a jet or
    drop goes by `gas_weber`, which regime maps often call by the same name.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    velocity : float or array
        Speed of the liquid [m/s].
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
    weber_radius : Half of this, on the radius.
    gas_weber : The number with the density of the gas.

    Notes
    -----
    ``We = rho U^2 d / gamma``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.weber(1000.0, "30 mN/m", "6 m/s", "30 um"), 6)
    36.0
    """
    return density * velocity * velocity * length / surface_tension


@physical(returns="ratio", velocity="velocity >= 0")
def weber_radius(density: float, surface_tension: float, velocity: float, radius: float) -> float:
    """Weber number We_a: inertia of the liquid against surface tension, on the radius.

    Half of the number on the diameter.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    velocity : float or array
        Speed of the liquid [m/s].
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
    weber : The number on the diameter.

    Notes
    -----
    ``We_a = rho U^2 a / gamma = We / 2``. The limit of absolute instability of a jet,
    3.12, is on the radius.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.weber_radius(1000.0, "30 mN/m", "6 m/s", "15 um"), 6)
    18.0
    """
    return density * velocity * velocity * radius / surface_tension


@physical(returns="ratio", velocity="velocity >= 0")
def gas_weber(surface_tension: float, velocity: float, length: float, gas_density: float) -> float:
    """Weber number of the gas We_g: inertia of the gas against surface tension.

    The number of the regime maps of jets and drops in a gas, which print it as "We".

    Parameters
    ----------
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    velocity : float or array
        Speed of the jet or drop relative to the gas [m/s].
    length : float or array
        Diameter of the jet or drop [m].
    gas_density : float or array
        Density of the gas [kg/m3].

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
    weber : The number with the density of the liquid.

    Notes
    -----
    ``We_g = rho_g U^2 d / gamma``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.gas_weber("72.3 mN/m", 9.3, "2.38 mm", 1.18), 2)
    3.36
    """
    return gas_density * velocity * velocity * length / surface_tension


@physical(returns="ratio", velocity="velocity >= 0")
def gas_weber_radius(
    surface_tension: float, velocity: float, radius: float, gas_density: float
) -> float:
    """Weber number of the gas We_ga: inertia of the gas against surface tension, on the radius.

    Half of the number on the diameter; dispersion relations of jets in a gas use it.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    velocity : float or array
        Speed of the jet or drop relative to the gas [m/s].
    radius : float or array
        Radius of the jet or drop [m].
    gas_density : float or array
        Density of the gas [kg/m3].

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
    gas_weber : The number on the diameter.

    Notes
    -----
    ``We_ga = rho_g U^2 a / gamma = We_g / 2``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.gas_weber_radius("72.3 mN/m", 9.3, "1.19 mm", 1.18), 2)
    1.68
    """
    return gas_density * velocity * velocity * radius / surface_tension
