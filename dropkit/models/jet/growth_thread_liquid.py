"""Growth of waves on a viscous thread in a second viscous liquid, without inertia: Tomotika 1935."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.jet._two_liquids import band, fastest, growth
from dropkit.models.jet.growth_inviscid import GrowthBand
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = [
    "growth_band_thread_in_liquid",
    "growth_rate_thread_in_liquid",
    "maximum_growth_thread_in_liquid",
    "most_unstable_wavelength_thread_in_liquid",
]

# Rounding in pi d / wavelength must not put the cut-off itself out of range.
_ROUNDING: Final = 1e-12
GROWING: Final = Range(0.0, 1.0 + _ROUNDING, "the reduced wavenumber pi d / wavelength", "")

MODEL: Final = Published(
    gives="growth rate of a wave, the most unstable wave and its band, for a thread in a second "
    "liquid at any ratio of the viscosities",
    holds="two Newtonian liquids at rest, so viscous that inertia does not count (Ohnesorge number "
    "of thread and surroundings far above 1), no surfactant, thread far from walls",
    sources=("Tomotika1935",),
    mark="C",
    place="four conditions on the surface, Stokes flow on both sides",
    ranges=(GROWING,),
    agreement="the four conditions solved in 30 digits: 1e-14 of the growth rate for ratios of 1e-8 "
    "to 1e8; largest k a of the fastest wave 0.590 at a ratio of 0.284, Tomotika's own 0.589 at "
    "0.28 [M+]; no measured growth rates were found",
)


@physical(returns="growth_rate")
def growth_rate_thread_in_liquid(
    viscosity: float,
    outer_viscosity: float,
    interfacial_tension: float,
    jet_diameter: float,
    wavelength: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Growth rate of a small wave on a liquid thread in a second liquid, both viscous.

    Holds for Newtonian liquids at rest without inertia (Ohnesorge numbers far above 1), at any
    ratio of their viscosities, and wavelengths above the cut-off at pi diameters, where it is 0.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the thread [Pa*s].
    outer_viscosity : float or array
        Dynamic viscosity of the liquid around it [Pa*s].
    interfacial_tension : float or array
        Tension between the two liquids [N/m].
    jet_diameter : float or array
        Diameter of the thread [m].
    wavelength : float or array
        Length of the wave along the thread [m].
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
        For a wavelength below pi diameters, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    Stokes flow on both sides, continuous velocities and shear stress, the capillary jump of the
    normal stress: four conditions, solved in closed form [C]. With ``x = pi d/wavelength``, ``a``
    the radius and the thread alone it tends to ``(gamma/(2 mu a)) (1 - x^2)/[x^2 I0^2/I1^2 - 1 -
    x^2]``, with the surroundings alone (a hollow thread) to ``(gamma/(2 mu_o a)) (1 - x^2)/[1 + x^2
    - x^2 K0^2/K1^2]``.

    References
    ----------
    S. Tomotika, Proc. R. Soc. Lond. A 150 (1935) 322-337, doi:10.1098/rspa.1935.0104.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> grow = jet.growth_rate_thread_in_liquid
    >>> print(f"{grow('1 Pa*s', '0.5 Pa*s', '5 mN/m', '100 um', '600 um'):.2f}")
    5.12 / second
    """
    x: Any = math.pi * jet_diameter / wavelength
    mask = outside_mask("growth_rate_thread_in_liquid", outside, (x, GROWING))
    speed: Any = 2.0 * interfacial_tension / jet_diameter
    result: float = blank_outside(speed * growth(x, viscosity, outer_viscosity), mask)
    return result


@physical(returns="length")
def most_unstable_wavelength_thread_in_liquid(
    viscosity: float, outer_viscosity: float, jet_diameter: float
) -> float:
    """Wavelength that grows fastest on a liquid thread in a second liquid, both viscous.

    Holds for Newtonian liquids at rest without inertia. It is shortest, 5.3 diameters, at a ratio of
    thread to surroundings of 0.28, and grows without limit towards 0 and infinity.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the thread [Pa*s].
    outer_viscosity : float or array
        Dynamic viscosity of the liquid around it [Pa*s].
    jet_diameter : float or array
        Diameter of the thread [m].

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
    The maximum of `growth_rate_thread_in_liquid` over the wavelength [C]; the tension between the
    liquids sets the pace, not the wavelength. Without inertia a thread without surroundings has no
    fastest wave: the longest grows fastest.

    References
    ----------
    S. Tomotika, Proc. R. Soc. Lond. A 150 (1935) 322-337, doi:10.1098/rspa.1935.0104.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> wave = jet.most_unstable_wavelength_thread_in_liquid
    >>> print(f"{wave('1 Pa*s', '0.5 Pa*s', '100 um'):.0f}")
    597 micrometer
    """
    t, _ = fastest(viscosity, outer_viscosity)
    result: float = math.pi * jet_diameter / t**0.5
    return result


@physical(returns="growth_rate")
def maximum_growth_thread_in_liquid(
    viscosity: float, outer_viscosity: float, interfacial_tension: float, jet_diameter: float
) -> float:
    """Growth rate of the fastest-growing wave on a liquid thread in a second liquid.

    Holds for Newtonian liquids at rest without inertia, at any ratio of their viscosities.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the thread [Pa*s].
    outer_viscosity : float or array
        Dynamic viscosity of the liquid around it [Pa*s].
    interfacial_tension : float or array
        Tension between the two liquids [N/m].
    jet_diameter : float or array
        Diameter of the thread [m].

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
    The maximum of `growth_rate_thread_in_liquid` over the wavelength [C].

    References
    ----------
    S. Tomotika, Proc. R. Soc. Lond. A 150 (1935) 322-337, doi:10.1098/rspa.1935.0104.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> fast = jet.maximum_growth_thread_in_liquid
    >>> print(f"{fast('1 Pa*s', '0.5 Pa*s', '5 mN/m', '100 um'):.2f}")
    5.12 / second
    """
    speed: Any = 2.0 * interfacial_tension / jet_diameter
    _, w = fastest(viscosity, outer_viscosity)
    result: float = speed * w
    return result


@physical(returns=("length", "length"), share="fraction")
def growth_band_thread_in_liquid(
    viscosity: float, outer_viscosity: float, jet_diameter: float, *, share: float = 0.8
) -> GrowthBand:
    """Wavelengths that grow at a share of the fastest growth or more, thread in a second liquid.

    Holds for Newtonian liquids at rest without inertia, at any ratio of their viscosities.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity of the thread [Pa*s].
    outer_viscosity : float or array
        Dynamic viscosity of the liquid around it [Pa*s].
    jet_diameter : float or array
        Diameter of the thread [m].
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
    The two roots of the relation at ``share`` of its maximum [C].

    References
    ----------
    S. Tomotika, Proc. R. Soc. Lond. A 150 (1935) 322-337, doi:10.1098/rspa.1935.0104.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> ends = jet.growth_band_thread_in_liquid("1 Pa*s", "0.5 Pa*s", "100 um")
    >>> print(f"{ends.shortest:.0f} to {ends.longest:.0f}")
    429 micrometer to 967 micrometer
    """
    low, high = band(viscosity, outer_viscosity, share)
    around: Any = math.pi * jet_diameter
    return GrowthBand(around / high**0.5, around / low**0.5)
