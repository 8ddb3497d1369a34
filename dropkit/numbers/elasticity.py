"""Numbers of liquids with a memory or a yield stress."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = ["bingham", "deborah", "elastocapillary", "weissenberg"]


@physical(returns="ratio", relaxation_time="time >= 0")
def deborah(density: float, surface_tension: float, relaxation_time: float, radius: float) -> float:
    """Deborah number De: memory of the liquid against the time of capillary breakup.

    On the RADIUS of the jet or filament, as work on thinning filaments has it.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    relaxation_time : float or array
        Longest relaxation time of the liquid in extension [s].
    radius : float or array
        Radius of the jet, drop or filament [m].

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
    elastocapillary : The same against the viscous time: ``De / Oh_a``.

    Notes
    -----
    ``De = lambda / (rho a^3 / gamma)^(1/2)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.deborah(1000.0, "60 mN/m", "1 ms", "50 um"), 3)
    21.909
    """
    number: float = relaxation_time / (density * radius * radius * radius / surface_tension) ** 0.5
    return number


@physical(returns="ratio", relaxation_time="time >= 0")
def elastocapillary(
    viscosity: float, surface_tension: float, relaxation_time: float, radius: float
) -> float:
    """Elastocapillary number Ec: memory of the liquid against its viscous thinning time.

    On the RADIUS. Contains no speed: it belongs to a liquid and a size.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the liquid at rest [Pa*s].
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    relaxation_time : float or array
        Longest relaxation time of the liquid in extension [s].
    radius : float or array
        Radius of the jet, drop or filament [m].

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
    deborah : The same against the time of inertial breakup.

    Notes
    -----
    ``Ec = lambda gamma / (mu a) = De / Oh_a``. Work on drop impact gives the same name to
    ``G a / gamma``, with the elastic modulus, and work on thin sheets to ``gamma L^2 / B``, with
    the bending stiffness: neither is this one.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.elastocapillary("10 mPa*s", "60 mN/m", "1 ms", "50 um"), 6)
    120.0
    """
    return relaxation_time * surface_tension / (viscosity * radius)


@physical(returns="ratio", relaxation_time="time >= 0", shear_rate="shear_rate >= 0")
def weissenberg(relaxation_time: float, shear_rate: float) -> float:
    """Weissenberg number Wi: memory of the liquid against the rate of shear.

    Above about 1 the liquid in the nozzle is stretched and doesn't have the viscosity at rest.

    Parameters
    ----------
    relaxation_time : float or array
        Relaxation time of the liquid [s].
    shear_rate : float or array
        Shear rate, or rate of extension [1/s].

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
    ``Wi = lambda (shear rate)``. At the wall of a round nozzle the rate is ``8 U / d`` for a
    Newtonian liquid.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.weissenberg("20 us", 1e5), 9)
    2.0
    """
    return relaxation_time * shear_rate


@physical(returns="ratio", velocity="velocity > 0", yield_stress="yield_stress >= 0")
def bingham(viscosity: float, yield_stress: float, velocity: float, length: float) -> float:
    """Bingham number Bm: yield stress of the liquid against viscous stress.

    Parameters
    ----------
    viscosity : float or array
        Plastic viscosity of the liquid, beyond the yield stress [Pa*s].
    yield_stress : float or array
        Yield stress [Pa].
    velocity : float or array
        Speed [m/s].
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

    Notes
    -----
    ``Bm = tau_y d / (mu U)``. Some authors write ``Bi``, which is Biot's number here.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.bingham(0.1, 10.0, 1.0, "1 mm"), 9)
    0.1
    """
    return yield_stress * length / (viscosity * velocity)
