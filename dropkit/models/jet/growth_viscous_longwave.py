"""Growth of waves on a viscous jet in vacuum, long waves, closed form: Weber 1931."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.jet._viscous_relation import longwave_band
from dropkit.models.jet.growth_inviscid import GrowthBand
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = [
    "growth_band_viscous_longwave",
    "growth_rate_viscous_longwave",
    "maximum_growth_viscous_longwave",
    "most_unstable_wavelength_viscous_longwave",
]

# Rounding in pi d / wavelength must not put the cut-off itself out of range.
_ROUNDING: Final = 1e-12
GROWING: Final = Range(0.0, 1.0 + _ROUNDING, "the reduced wavenumber pi d / wavelength", "")

MODEL: Final = Published(
    gives="growth rate of a wave and the most unstable wave and its band, with viscosity, in closed form",
    holds="Newtonian liquid, gas Weber number far below 1, uniform velocity, small long waves",
    sources=("Weber1931",),
    mark="C",
    place="w^2 + 3 (mu/rho) k^2 w = gamma/(2 rho a^3) x^2 (1 - x^2)",
    ranges=(GROWING,),
    agreement="maximum growth against the full viscous relation: +3.0 % at Ohnesorge number 0, "
    "+2.2 % at 0.1, +0.3 % at 1 (on the radius) [C]; no measured growth rates were found",
)


@physical(returns="growth_rate")
def growth_rate_viscous_longwave(
    density: float,
    viscosity: float,
    surface_tension: float,
    jet_diameter: float,
    wavelength: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Growth rate of a small long wave on a viscous jet.

    Holds for Newtonian liquids of any viscosity in still gas, for wavelengths above the cut-off
    at pi jet diameters, where it is 0.

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
    wavelength : float or array
        Length of the wave along the jet [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens below the cut-off, where waves decay; "warn" and "allow" give the decay as a
        negative growth rate.

    Returns
    -------
    float or array
        Amplitudes grow as exp(growth rate x time) [1/s].

    Raises
    ------
    OutOfRange
        For a wavelength below pi jet diameters, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The larger root of ``w^2 + 3 (mu/rho) k^2 w = gamma/(2 rho a^3) x^2 (1 - x^2)``,
    ``k = 2 pi/wavelength``, ``x = k a``, ``a`` the radius. Valid for 0 < x <= 1. Formula [C].
    At the maximum it lies 3 % above the full relation for thin liquids, 0.3 % above it at an
    Ohnesorge number (on the radius) of 1.

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> round(jet.growth_rate_viscous_longwave(1100.0, 0.010, 0.065, 60e-6, 300e-6))
    11259
    """
    x: Any = math.pi * jet_diameter / wavelength
    mask = outside_mask("growth_rate_viscous_longwave", outside, (x, GROWING))
    wavenumber = 2.0 * math.pi / wavelength
    damping = 1.5 * (viscosity / density) * wavenumber * wavenumber
    radius = 0.5 * jet_diameter
    drive = surface_tension / (2.0 * density * radius**3) * (x * x * (1.0 - x * x))
    inner: Any = damping * damping + drive
    root = (inner * (inner > 0.0)) ** 0.5
    # Written so that no digits are lost where viscosity rules: drive/(b + r), not r - b.
    real_part = drive / (damping + root) * (inner >= 0.0) - damping * (inner < 0.0)
    result: float = blank_outside(real_part, mask)
    return result


@physical(returns="length")
def most_unstable_wavelength_viscous_longwave(
    density: float, viscosity: float, surface_tension: float, jet_diameter: float
) -> float:
    """Wavelength that grows fastest on a viscous jet, long-wave closed form.

    Holds for Newtonian liquids of any viscosity in still gas.

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
        The wavelength [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``wavelength = sqrt(2) pi d (1 + 3 Oh)^(1/2)`` [C], exact for this equation, with
    ``Oh = mu/sqrt(rho gamma d)`` on the DIAMETER; on the radius the 3 would be 3/sqrt(2). For
    a thin liquid it gives 4.443 d where the exact inviscid theory gives 4.507 d.

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> wave = jet.most_unstable_wavelength_viscous_longwave
    >>> print(f"{wave('1100 kg/m3', '10 mPa*s', '65 mN/m', '60 um'):.0f}")
    322 micrometer
    """
    ohnesorge: Any = viscosity / (density * surface_tension * jet_diameter) ** 0.5
    result: float = math.sqrt(2.0) * math.pi * jet_diameter * (1.0 + 3.0 * ohnesorge) ** 0.5
    return result


@physical(returns="growth_rate")
def maximum_growth_viscous_longwave(
    density: float, viscosity: float, surface_tension: float, jet_diameter: float
) -> float:
    """Growth rate of the fastest-growing wave on a viscous jet, long-wave closed form.

    Holds for Newtonian liquids of any viscosity in still gas.

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
        The growth rate [1/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``w = sqrt(gamma/(rho d^3)) / (1 + 3 Oh)`` [C], with ``Oh`` on the diameter; the same as
    ``sqrt(gamma/(rho a^3)) / (2 sqrt(2) + 6 Oh_a)`` on the radius.

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> round(jet.maximum_growth_viscous_longwave(1100.0, 0.010, 0.065, 60e-6))
    11344
    """
    ohnesorge: Any = viscosity / (density * surface_tension * jet_diameter) ** 0.5
    scale: Any = surface_tension / (density * jet_diameter**3)
    result: float = scale**0.5 / (1.0 + 3.0 * ohnesorge)
    return result


@physical(returns=("length", "length"), share="fraction")
def growth_band_viscous_longwave(
    density: float,
    viscosity: float,
    surface_tension: float,
    jet_diameter: float,
    *,
    share: float = 0.8,
) -> GrowthBand:
    """Wavelengths that grow at a share of the fastest growth or more, long-wave closed form.

    Holds for Newtonian liquids of any viscosity in still gas.

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
    share : float or array, keyword-only
        Growth rate at the ends over its maximum [-]; 0.8 by default.

    Returns
    -------
    GrowthBand
        ``shortest`` and ``longest`` wavelength [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    With ``A = 2 sqrt(2) + 6 Oh_a`` and ``B = A - 6 Oh_a share`` the ends are at
    ``x^2 = [B +- sqrt((1 - share) A (B + 2 sqrt(2) share))] / (2 A)`` [C], exact for this equation.
    A share of 0 has no longest wavelength: NaN, with one warning.

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> band = jet.growth_band_viscous_longwave("1100 kg/m3", "10 mPa*s", "65 mN/m", "60 um")
    >>> print(f"{band.shortest:.0f} to {band.longest:.0f}")
    238 micrometer to 545 micrometer
    """
    radius = 0.5 * jet_diameter
    ohnesorge: Any = viscosity / (density * surface_tension * radius) ** 0.5
    low, high = longwave_band(ohnesorge, share)
    return GrowthBand(math.pi * jet_diameter / high**0.5, math.pi * jet_diameter / low**0.5)
