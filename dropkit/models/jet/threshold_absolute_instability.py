"""Speed at which a jet turns from dripping to jetting by absolute instability: Leib & Goldstein."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.jet._absolute_threshold import threshold_speed
from dropkit.models.jet._complex_relation import V_CRITICAL
from dropkit.models.published import Published

__all__ = [
    "absolute_instability_velocity_inviscid",
    "absolute_instability_velocity_viscous",
    "absolute_instability_weber_viscous",
    "absolute_instability_weber_viscous_radius",
]

MODEL: Final = Published(
    gives="speed and Weber number below which waves grow in place, inviscid and at any viscosity",
    holds="uniform velocity, no gravity, gas Weber number far below 1, small waves; the parabolic "
    "profile near a tube changes it markedly",
    sources=("LeibGoldstein1986", "KellerRubinowTu1973", "Chandrasekhar1961"),
    mark="C",
    place="dOmega/dk = 0 at Im Omega = 0 for Omega = k U + i w(k)",
    agreement="Weber number on the radius 3.12255 inviscid (the literature quotes about 3.1 [M+]), "
    "2.6256, 1.4876, 0.7327 at Ohnesorge numbers (on the radius) of 0.01, 0.1, 0.3 [C]; the "
    "viscous curve of the paper and measured points were not seen",
)


@physical(returns="velocity")
def absolute_instability_velocity_inviscid(
    density: float, surface_tension: float, jet_diameter: float
) -> float:
    """Speed below which waves on an inviscid jet grow in place, so that it drips.

    Holds for thin liquids (Ohnesorge number far below 1) with one speed over the section, without
    gravity. Viscosity lowers it (`absolute_instability_velocity_viscous`).

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].

    Returns
    -------
    float or array
        The speed of the jet [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``rho U^2 a/gamma = 3.12255`` on the RADIUS, 6.24510 on the diameter, at ``k a = 1.2811`` [C].
    The long-wave equation would give 4 and 8.

    References
    ----------
    S. J. Leib, M. E. Goldstein, J. Fluid Mech. 168 (1986) 479.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> limit = jet.absolute_instability_velocity_inviscid
    >>> print(f"{limit('998 kg/m3', '72.7 mN/m', '100 um'):.3f}")
    2.133 meter / second
    """
    root: Any = (2.0 * surface_tension / (density * jet_diameter)) ** 0.5
    result: float = V_CRITICAL * root
    return result


@physical(returns="velocity")
def absolute_instability_velocity_viscous(
    density: float, viscosity: float, surface_tension: float, jet_diameter: float
) -> float:
    """Speed below which waves on a viscous jet grow in place, so that it drips.

    Holds for Newtonian liquids of any viscosity with one speed over the section, without gravity.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].

    Returns
    -------
    float or array
        The speed of the jet [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Omega = k U + i w(k)`` with the growth rate w of the full relation; the saddle of Omega where
    its imaginary part vanishes, followed from U = 0 [C].

    References
    ----------
    S. J. Leib, M. E. Goldstein, Phys. Fluids 29 (1986) 952.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> limit = jet.absolute_instability_velocity_viscous
    >>> print(f"{limit('998 kg/m3', '10 mPa*s', '72.7 mN/m', '100 um'):.3f}")
    1.283 meter / second
    """
    ohnesorge: Any = viscosity / (0.5 * density * surface_tension * jet_diameter) ** 0.5
    root: Any = (2.0 * surface_tension / (density * jet_diameter)) ** 0.5
    result: float = threshold_speed(ohnesorge) * root
    return result


@physical(returns="ratio")
def absolute_instability_weber_viscous(
    density: float, viscosity: float, surface_tension: float, jet_diameter: float
) -> float:
    """Weber number on the DIAMETER below which waves on a viscous jet grow in place.

    Holds as `absolute_instability_velocity_viscous` does.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].

    Returns
    -------
    float or array
        The Weber number of the liquid, on the diameter [-].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    absolute_instability_weber_viscous_radius : The same on the radius, as papers have it.

    Notes
    -----
    From 6.24510 for a thin liquid to 0.45360 for a thick one [C].

    References
    ----------
    S. J. Leib, M. E. Goldstein, Phys. Fluids 29 (1986) 952.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> limit = jet.absolute_instability_weber_viscous
    >>> round(limit("998 kg/m3", "10 mPa*s", "72.7 mN/m", "100 um"), 4)
    2.2609
    """
    ohnesorge: Any = viscosity / (0.5 * density * surface_tension * jet_diameter) ** 0.5
    speed: Any = threshold_speed(ohnesorge)
    result: float = 2.0 * speed * speed
    return result


@physical(returns="ratio")
def absolute_instability_weber_viscous_radius(
    density: float, viscosity: float, surface_tension: float, radius: float
) -> float:
    """Weber number on the RADIUS below which waves on a viscous jet grow in place.

    Holds as `absolute_instability_velocity_viscous` does.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    radius : float or array
        Radius of the jet, not of the nozzle [m].

    Returns
    -------
    float or array
        The Weber number of the liquid, on the radius [-].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    From 3.12255 for a thin liquid to 0.22680 for a thick one [C].

    References
    ----------
    S. J. Leib, M. E. Goldstein, Phys. Fluids 29 (1986) 952.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> limit = jet.absolute_instability_weber_viscous_radius
    >>> round(limit(1000.0, 0.1e-3, 0.05, 20e-6), 4)  # Ohnesorge number 0.00316
    2.8755
    """
    ohnesorge: Any = viscosity / (density * surface_tension * radius) ** 0.5
    speed: Any = threshold_speed(ohnesorge)
    result: float = speed * speed
    return result
