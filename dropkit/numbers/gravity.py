"""Numbers that compare weight with surface tension and viscosity."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = ["archimedes", "bond", "bond_radius", "bond_root", "galilei", "morton"]


@physical(returns="ratio", gravity="acceleration >= 0")
def bond(density: float, surface_tension: float, length: float, gravity: float = 9.80665) -> float:
    """Bond number Bo: weight against surface tension.

    Also called the Eoetvoes number.

    Parameters
    ----------
    density : float or array
        Density of the liquid; in another liquid, the difference of the densities [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the drop, jet or tip [m].
    gravity : float or array
        Acceleration of gravity [m/s2].

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
    bond_radius : A quarter of this, on the radius.
    bond_root : The square-root form of Clanet and Lasheras, with a factor 2.

    Notes
    -----
    ``Bo = rho g d^2 / gamma``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.bond(998.2, "72.7 mN/m", "2 mm"), 4)
    0.5386
    """
    return density * gravity * length * length / surface_tension


@physical(returns="ratio", gravity="acceleration >= 0")
def bond_radius(
    density: float, surface_tension: float, radius: float, gravity: float = 9.80665
) -> float:
    """Bond number Bo_a: weight against surface tension, on the radius.

    A quarter of the number on the diameter.

    Parameters
    ----------
    density : float or array
        Density of the liquid; in another liquid, the difference of the densities [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    radius : float or array
        Radius of the drop, jet or tip [m].
    gravity : float or array
        Acceleration of gravity [m/s2].

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
    bond : The number on the diameter.

    Notes
    -----
    ``Bo_a = rho g a^2 / gamma = Bo / 4``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.bond_radius(998.2, "72.7 mN/m", "1 mm"), 4)
    0.1346
    """
    return density * gravity * radius * radius / surface_tension


@physical(returns="ratio", gravity="acceleration >= 0")
def bond_root(
    density: float, surface_tension: float, length: float, gravity: float = 9.80665
) -> float:
    """Root form of the Bond number Bo_CL: tip size against the length where weight wins.

    The form in which Clanet and Lasheras write the change from dripping to jetting: a square
    root, with a factor 2 below the fraction. It is not the Bond number of other authors.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the tip, inner or outer: the model takes both [m].
    gravity : float or array
        Acceleration of gravity [m/s2].

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
    bond : The common form.

    Notes
    -----
    ``Bo_CL = [rho g d^2 / (2 gamma)]^(1/2) = (Bo / 2)^(1/2)``.

    References
    ----------
    Clanet C., Lasheras J.C., J. Fluid Mech. 383 (1999) 307-326 (definition seen in the abstract).

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.bond_root(998.2, "72.7 mN/m", "2 mm"), 4)
    0.5189
    """
    number: float = (density * gravity * length * length / (2.0 * surface_tension)) ** 0.5
    return number


@physical(returns="ratio", gas_density="density >= 0", gravity="acceleration >= 0")
def morton(
    density: float,
    viscosity: float,
    surface_tension: float,
    gas_density: float = 0.0,
    gravity: float = 9.80665,
) -> float:
    """Morton number Mo: weight and viscosity against surface tension and inertia.

    Contains neither size nor speed: it belongs to a liquid, or to a pair of fluids.

    Parameters
    ----------
    density : float or array
        Density of the continuous liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the continuous liquid [Pa*s].
    surface_tension : float or array
        Surface tension, or interfacial tension between two liquids [N/m].
    gas_density : float or array
        Density of what moves through the liquid, bubble or drop [kg/m3].
    gravity : float or array
        Acceleration of gravity [m/s2].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments; negative where `gas_density` is
        above `density`.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Mo = g mu^4 (rho - rho_g) / (rho^2 gamma^3)``; with a thin gas ``g mu^4 / (rho gamma^3) =
    Bo Oh^4 = We^3 / (Fr^2 Re^4)``. Density and viscosity are those of the continuous phase.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.morton(1077.0, 4.27e-3, 0.023, 76.5, gravity=9.80665) * 1e7, 5)
    2.31118
    """
    return (
        gravity
        * (viscosity * viscosity)
        * (viscosity * viscosity)
        * (density - gas_density)
        / (density * density * surface_tension * surface_tension * surface_tension)
    )


@physical(returns="ratio", gravity="acceleration >= 0")
def galilei(density: float, viscosity: float, length: float, gravity: float = 9.80665) -> float:
    """Galilei number Ga: weight against viscosity.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    length : float or array
        Diameter of the drop or jet, or the thickness of a film where that is meant [m].
    gravity : float or array
        Acceleration of gravity [m/s2].

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
    archimedes : The form with a difference of densities, for a drop in a gas.

    Notes
    -----
    ``Ga = g rho^2 d^3 / mu^2 = Re^2 / Fr^2``. Some authors take the square root of this.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.galilei(1000.0, 1e-3, "1 mm"), 2)
    9806.65
    """
    return gravity * density * density * length * length * length / (viscosity * viscosity)


@physical(returns="ratio", gravity="acceleration >= 0")
def archimedes(
    density: float,
    length: float,
    gas_density: float,
    gas_viscosity: float,
    gravity: float = 9.80665,
) -> float:
    """Archimedes number Ar: weight less buoyancy of a drop against the viscosity around it.

    Fixes the falling speed of a drop that stays round.

    Parameters
    ----------
    density : float or array
        Density of the drop [kg/m3].
    length : float or array
        Diameter of the drop [m].
    gas_density : float or array
        Density of the gas, or liquid, around the drop [kg/m3].
    gas_viscosity : float or array
        Dynamic viscosity of the gas, or liquid, around the drop [Pa*s].
    gravity : float or array
        Acceleration of gravity [m/s2].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments; negative for a drop that rises.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Ar = g rho_g (rho - rho_g) d^3 / mu_g^2``. Falling in Stokes' regime, ``Re_g = Ar / 18``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.archimedes(3000.0, "2 mm", 2.0, "1 mPa*s"), 5)
    470.40539
    """
    return (
        gravity
        * gas_density
        * (density - gas_density)
        * length
        * length
        * length
        / (gas_viscosity * gas_viscosity)
    )
