"""Growth of waves on a viscous jet in vacuum at any wavelength: the full relation."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.jet._complex_relation import decay
from dropkit.models.jet._viscous_relation import band, fastest, growth
from dropkit.models.jet.growth_inviscid import GrowthBand
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = [
    "growth_band_viscous_full",
    "growth_rate_viscous_full",
    "maximum_growth_viscous_full",
    "most_unstable_wavelength_viscous_full",
    "reduced_growth_viscous_full",
]

# Rounding in pi d / wavelength must not put the cut-off itself out of range.
_ROUNDING: Final = 1e-12
GROWING: Final = Range(0.0, 1.0 + _ROUNDING, "the reduced wavenumber pi d / wavelength", "")

MODEL: Final = Published(
    gives="growth rate of a wave, the most unstable wave and its band, at any viscosity and "
    "wavelength",
    holds="Newtonian liquid, gas Weber number far below 1, uniform velocity, small waves, no "
    "surfactant",
    sources=("Rayleigh1892", "Chandrasekhar1961"),
    mark="C",
    place="Rayleigh's and Chandrasekhar's relation of the axisymmetric mode",
    ranges=(GROWING,),
    agreement="both printed forms solved in 60 digits: 2e-15 of the growth rate for Ohnesorge "
    "numbers (on the radius) of 1e-12 to 1e12; no measured growth rates were found",
)


@physical(returns="growth_rate")
def growth_rate_viscous_full(
    density: float,
    viscosity: float,
    surface_tension: float,
    jet_diameter: float,
    wavelength: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Growth rate of a small wave on a viscous jet, exact for linear waves.

    Holds for Newtonian liquids of any viscosity in still gas and any wavelength above the cut-off
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
        What happens below the cut-off, where waves decay; "warn" and "allow" give the decay of
        the slowest capillary wave as a negative growth rate down to a fifth of the cut-off.

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

    See Also
    --------
    growth_rate_viscous_longwave : Weber's closed form, 3 % above this at most at the fastest wave,
        6 % near the cut-off.

    Notes
    -----
    With ``x = pi d/wavelength``, ``l^2 = k^2 + w rho/mu``, ``y = l a``, ``a`` the radius:
    ``w^2 + (2 nu k^2/I0(x)) [I1'(x) - (2 k l/(k^2 + l^2)) (I1(x)/I1(y)) I1'(y)] w
    = (gamma k/(rho a^2)) (1 - x^2) (I1(x)/I0(x)) (l^2 - k^2)/(l^2 + k^2)`` [C]. It is solved in an
    equal form whose terms stay of order one, so that no difference loses digits as the viscosity
    goes to 0 or without limit.

    References
    ----------
    Lord Rayleigh, Phil. Mag. 34 (1892) 145-154.
    S. Chandrasekhar, Hydrodynamic and Hydromagnetic Stability, Oxford 1961, chapter XII.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> round(jet.growth_rate_viscous_full(1100.0, 0.010, 0.065, 60e-6, 300e-6))
    11071
    """
    x: Any = math.pi * jet_diameter / wavelength
    mask = outside_mask("growth_rate_viscous_full", outside, (x, GROWING))
    radius = 0.5 * jet_diameter
    ohnesorge: Any = viscosity / (density * surface_tension * radius) ** 0.5
    scale: Any = (surface_tension / (density * radius**3)) ** 0.5
    result: float = blank_outside(scale * _reduced(x, ohnesorge, mask), mask)
    return result


@physical(returns="ratio", reduced_wavenumber="ratio > 0", ohnesorge_radius="ratio > 0")
def reduced_growth_viscous_full(
    reduced_wavenumber: float, ohnesorge_radius: float, *, outside: Outside = "raise"
) -> float:
    """Growth rate of a small wave on a viscous jet in dimensionless form.

    Holds as `growth_rate_viscous_full` does, for the same relation.

    Parameters
    ----------
    reduced_wavenumber : float or array
        k a, the circumference of the jet over the wavelength [-].
    ohnesorge_radius : float or array
        Ohnesorge number on the RADIUS of the jet, sqrt(2) of that on its diameter [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above 1, where waves decay; as in `growth_rate_viscous_full`.

    Returns
    -------
    float or array
        The growth rate times sqrt(rho a^3/gamma) [-].

    Raises
    ------
    OutOfRange
        For a reduced wavenumber above 1, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    See `growth_rate_viscous_full` [C].

    References
    ----------
    S. Chandrasekhar, Hydrodynamic and Hydromagnetic Stability, Oxford 1961, chapter XII.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.reduced_growth_viscous_full(0.7, 0.1):.12f}")
    0.280418798793
    """
    mask = outside_mask("reduced_growth_viscous_full", outside, (reduced_wavenumber, GROWING))
    result: float = blank_outside(_reduced(reduced_wavenumber, ohnesorge_radius, mask), mask)
    return result


@physical(returns="length")
def most_unstable_wavelength_viscous_full(
    density: float, viscosity: float, surface_tension: float, jet_diameter: float
) -> float:
    """Wavelength that grows fastest on a viscous jet, by the full relation.

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
    Where the derivative of the relation by the wavenumber vanishes [C]: 4.507 d for a thin liquid,
    Weber's ``sqrt(2) pi d (1 + 3 Oh)^(1/2)`` for a thick one, within 1.4 % of Weber's at any.

    References
    ----------
    S. Chandrasekhar, Hydrodynamic and Hydromagnetic Stability, Oxford 1961, chapter XII.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> wave = jet.most_unstable_wavelength_viscous_full
    >>> print(f"{wave('1100 kg/m3', '10 mPa*s', '65 mN/m', '60 um'):.1f}")
    324.6 micrometer
    """
    radius = 0.5 * jet_diameter
    ohnesorge: Any = viscosity / (density * surface_tension * radius) ** 0.5
    t, _ = fastest(ohnesorge)
    result: float = math.pi * jet_diameter / t**0.5
    return result


@physical(returns="growth_rate")
def maximum_growth_viscous_full(
    density: float, viscosity: float, surface_tension: float, jet_diameter: float
) -> float:
    """Growth rate of the fastest-growing wave on a viscous jet, by the full relation.

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
    See `growth_rate_viscous_full` [C]: ``0.34334 sqrt(gamma/(rho a^3))`` for a thin liquid,
    ``gamma/(6 mu a)`` for a thick one, ``a`` the radius.

    References
    ----------
    S. Chandrasekhar, Hydrodynamic and Hydromagnetic Stability, Oxford 1961, chapter XII.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> round(jet.maximum_growth_viscous_full(1100.0, 0.010, 0.065, 60e-6))
    11174
    """
    radius = 0.5 * jet_diameter
    ohnesorge: Any = viscosity / (density * surface_tension * radius) ** 0.5
    scale: Any = (surface_tension / (density * radius**3)) ** 0.5
    _, w = fastest(ohnesorge)
    result: float = scale * w
    return result


@physical(returns=("length", "length"), share="fraction")
def growth_band_viscous_full(
    density: float,
    viscosity: float,
    surface_tension: float,
    jet_diameter: float,
    *,
    share: float = 0.8,
) -> GrowthBand:
    """Wavelengths that grow at a share of the fastest growth or more, by the full relation.

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
    The two roots of the full relation at ``share`` of its maximum [C]. A share of 0 has no longest
    wavelength: NaN, with one warning.

    References
    ----------
    S. Chandrasekhar, Hydrodynamic and Hydromagnetic Stability, Oxford 1961, chapter XII.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> found = jet.growth_band_viscous_full("1100 kg/m3", "10 mPa*s", "65 mN/m", "60 um")
    >>> print(f"{found.shortest:.0f} to {found.longest:.0f}")
    238 micrometer to 552 micrometer
    """
    radius = 0.5 * jet_diameter
    ohnesorge: Any = viscosity / (density * surface_tension * radius) ** 0.5
    low, high = band(ohnesorge, share)
    return GrowthBand(math.pi * jet_diameter / high**0.5, math.pi * jet_diameter / low**0.5)


def _reduced(x: Any, ohnesorge: Any, mask: Any) -> Any:
    """Growth of what grows, decay of what does not and is wanted."""
    if not isinstance(x, np.ndarray) and not isinstance(ohnesorge, np.ndarray):
        if not x > 1.0 + _ROUNDING:
            return growth(min(x, 1.0), ohnesorge)
        return math.nan if mask else float(decay(np.array([x]), np.array([ohnesorge]))[0])
    x, ohnesorge = np.broadcast_arrays(x, ohnesorge)
    result = growth(np.minimum(x, 1.0), ohnesorge)
    beyond = (x > 1.0 + _ROUNDING) & ~np.asarray(mask, dtype=bool)
    if beyond.any():
        result[beyond] = decay(x[beyond], ohnesorge[beyond])
    return result
