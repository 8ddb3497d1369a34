"""Numbers of flows driven by differences of surface tension."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = ["marangoni", "marangoni_mass"]


@physical(returns="ratio")
def marangoni(
    viscosity: float,
    surface_tension_slope: float,
    thermal_diffusivity: float,
    temperature_difference: float,
    length: float,
) -> float:
    """Marangoni number Ma: flow driven by heat along the surface against conduction of heat.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension_slope : float or array
        Change of surface tension with temperature; negative for most liquids [N/(m*K)].
    thermal_diffusivity : float or array
        Thermal diffusivity of the liquid, ``k / (rho c_p)`` [m2/s].
    temperature_difference : float or array
        Temperature difference along the surface, or across a film [K].
    length : float or array
        Diameter of the drop or jet, or the depth of a film where that is meant [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments; positive for a liquid whose surface
        tension falls with temperature.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    marangoni_mass : The same for differences of composition.

    Notes
    -----
    ``Ma = -(d gamma / dT) dT L / (mu alpha)``. Some authors divide by the viscosity squared over
    the density in place of ``mu alpha`` (a Reynolds number of that flow, ``Ma / Pr``).

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.marangoni("1 mPa*s", -0.15e-3, 1.43e-7, 1.0, "1 mm"), 1)
    1049.0
    """
    return (
        -surface_tension_slope * temperature_difference * length / (viscosity * thermal_diffusivity)
    )


@physical(returns="ratio", surface_tension_difference="surface_tension any")
def marangoni_mass(
    viscosity: float, surface_tension_difference: float, diffusivity: float, length: float
) -> float:
    """Marangoni number of matter Ma_m: flow driven by composition against diffusion.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension_difference : float or array
        Difference of surface tension along the surface [N/m].
    diffusivity : float or array
        Diffusivity of the component that makes the difference [m2/s].
    length : float or array
        Diameter of the drop or jet, or the depth of a film where that is meant [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments, with the sign of the difference.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    marangoni : The same for differences of temperature.

    Notes
    -----
    ``Ma_m = (difference of gamma) L / (mu D)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.marangoni_mass("1 mPa*s", "1 mN/m", 1e-9, "100 um"), 3)
    100000.0
    """
    return surface_tension_difference * length / (viscosity * diffusivity)
