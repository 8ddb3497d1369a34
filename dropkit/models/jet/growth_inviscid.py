"""Growth of waves on an inviscid jet in vacuum: Rayleigh 1878."""

from __future__ import annotations

import math
from typing import Any, Final, NamedTuple

from dropkit.boundary import physical
from dropkit.models.jet._series import bessel_ratio
from dropkit.models.jet._viscous_relation import inviscid_band
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = [
    "GrowthBand",
    "cut_off_wavelength",
    "growth_band_inviscid",
    "growth_rate_inviscid",
    "maximum_growth_inviscid",
    "most_unstable_wavelength_inviscid",
]

# Rounding in pi d / wavelength must not put the cut-off itself out of range.
_ROUNDING: Final = 1e-12
GROWING: Final = Range(0.0, 1.0 + _ROUNDING, "the reduced wavenumber pi d / wavelength", "")

# The maximum of x (1 - x^2) I1(x)/I0(x), computed to 30 digits [C].
X_MOST: Final = 0.6970188983063286
GROWTH_MOST: Final = 0.3433387018612993

MODEL: Final = Published(
    gives="growth rate of a wave, the most unstable wave, its band, and the cut-off",
    holds="Ohnesorge number far below 1, gas Weber number far below 1, uniform velocity, "
    "small waves, no surfactant",
    sources=("Rayleigh1878",),
    mark="C",
    place="w^2 = gamma/(rho a^3) x (1 - x^2) I1(x)/I0(x)",
    ranges=(GROWING,),
    agreement="no growth rates as numbers were found; it is known to agree with those of Donnelly & "
    "Glaberson 1966 and Goedde & Yuen 1970 [M]",
)


class GrowthBand(NamedTuple):
    """The wavelengths whose growth rate keeps a share of its maximum.

    Parameters
    ----------
    shortest, longest : float, array or Quantity
        Ends of the band [m].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> shortest, longest = jet.growth_band_inviscid(1.0)
    >>> print(f"{shortest:.2f} to {longest:.2f} jet diameters")
    3.53 to 7.19 jet diameters
    """

    shortest: Any
    longest: Any


@physical(returns="growth_rate")
def growth_rate_inviscid(
    density: float,
    surface_tension: float,
    jet_diameter: float,
    wavelength: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Growth rate of a small wave on an inviscid jet.

    Holds for thin liquids (Ohnesorge number far below 1) in still gas, for wavelengths above the
    cut-off at pi jet diameters, where it is 0.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    wavelength : float or array
        Length of the wave along the jet [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens below the cut-off, where waves do not grow; "warn" and "allow" give 0.

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
    ``w^2 = gamma/(rho a^3) x (1 - x^2) I1(x)/I0(x)``, ``x = 2 pi a/wavelength``, ``a`` the radius.
    Valid for 0 < x <= 1. Formula [C]: derived and computed, the paper was not seen. The values
    that it printed for x^2 = 0.05 to 0.8 are remembered and agree [M].

    References
    ----------
    Lord Rayleigh, Proc. Lond. Math. Soc. 10 (1878) 4-13.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> round(jet.growth_rate_inviscid(998.2, 0.0727, 60e-6, 270e-6))
    17832
    >>> jet.growth_rate_inviscid("998.2 kg/m3", "72.7 mN/m", "60 um", "150 um", outside="nan")
    <Quantity(nan, '1 / second')>
    """
    x: Any = math.pi * jet_diameter / wavelength
    mask = outside_mask("growth_rate_inviscid", outside, (x, GROWING))
    x = x * (x <= 1.0)  # beyond the cut-off waves oscillate: growth 0
    radius = 0.5 * jet_diameter
    squared = surface_tension / (density * radius**3) * (x * (1.0 - x * x) * bessel_ratio(x))
    result: float = blank_outside(squared**0.5, mask)
    return result


@physical(returns="length")
def most_unstable_wavelength_inviscid(jet_diameter: float) -> float:
    """Wavelength that grows fastest on an inviscid jet: 4.5072 jet diameters.

    Holds for thin liquids; viscosity makes it longer
    (`most_unstable_wavelength_viscous_longwave`).

    Parameters
    ----------
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
    ``wavelength/d = 4.50718432631`` [C]. Rayleigh printed 4.508, as quoted in the Encyclopaedia
    Britannica of 1911 [S2]. The long-wave theory gives sqrt(2) pi = 4.443 instead.

    References
    ----------
    Lord Rayleigh, Proc. Lond. Math. Soc. 10 (1878) 4-13.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.most_unstable_wavelength_inviscid('60 um'):.1f}")
    270.4 micrometer
    """
    return math.pi / X_MOST * jet_diameter


@physical(returns="growth_rate")
def maximum_growth_inviscid(density: float, surface_tension: float, jet_diameter: float) -> float:
    """Growth rate of the fastest-growing wave on an inviscid jet.

    Holds for thin liquids (Ohnesorge number far below 1) in still gas.

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
        The growth rate [1/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``w = 0.343338701861 sqrt(gamma/(rho a^3))`` [C], ``a`` the radius of the jet.

    References
    ----------
    Lord Rayleigh, Proc. Lond. Math. Soc. 10 (1878) 4-13.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> round(jet.maximum_growth_inviscid(998.2, 0.0727, 60e-6))
    17832
    """
    radius = 0.5 * jet_diameter
    scale: Any = surface_tension / (density * radius**3)
    result: float = GROWTH_MOST * scale**0.5
    return result


@physical(returns="length")
def cut_off_wavelength(jet_diameter: float) -> float:
    """Shortest wavelength that grows: pi jet diameters, at any viscosity.

    A shorter wave makes the surface larger, so that surface tension works against it.

    Parameters
    ----------
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
    ``wavelength = pi d`` [C]: growth vanishes at ``x = 1``. Gas at high speed moves it.

    References
    ----------
    Lord Rayleigh, Proc. Lond. Math. Soc. 10 (1878) 4-13.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.cut_off_wavelength('60 um'):.1f}")
    188.5 micrometer
    """
    return math.pi * jet_diameter


@physical(returns=("length", "length"), share="fraction")
def growth_band_inviscid(jet_diameter: float, *, share: float = 0.8) -> GrowthBand:
    """Wavelengths that grow at a share of the fastest growth or more, inviscid jet.

    Holds for thin liquids (Ohnesorge number far below 1) in still gas; viscosity moves the band to
    longer waves (`growth_band_viscous_full`).

    Parameters
    ----------
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
    The roots of ``x^2 (1 - x^2) / F(x) = share^2 w_max^2`` in dimensionless form [C]. For a share
    of 0.8 they lie at 3.53 and 7.19 jet diameters; 3.5 to 7 is the band commonly quoted. A share
    of 0 has no longest wavelength: NaN, with one warning.

    References
    ----------
    Lord Rayleigh, Proc. Lond. Math. Soc. 10 (1878) 4-13.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> band = jet.growth_band_inviscid("60 um")
    >>> print(f"{band.shortest:.0f} to {band.longest:.0f}")
    212 micrometer to 431 micrometer
    """
    low, high = inviscid_band(share, X_MOST * X_MOST, GROWTH_MOST)
    return GrowthBand(math.pi * jet_diameter / high**0.5, math.pi * jet_diameter / low**0.5)
