"""Diameter of a free jet from that of the tube: momentum balance over the profile's relaxation."""

from __future__ import annotations

import math
from typing import Final

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["jet_diameter_laminar_pipe", "jet_diameter_turbulent_pipe"]

LAMINAR: Final = Range(150.0, 2000.0, "the Reynolds number of the tube", "")
TURBULENT: Final = Range(4000.0, math.inf, "the Reynolds number of the tube", "")

# Momentum factors of the two profiles [C].
_PARABOLA: Final = math.sqrt(3.0) / 2.0
_SEVENTH_POWER: Final = math.sqrt(0.98)

MODEL: Final = Published(
    gives="diameter of the jet from a long tube, after its velocity profile has become flat",
    holds="fully developed flow in a long tube, surface tension and gravity negligible while the "
    "profile relaxes (liquid Weber number far above 1)",
    sources=("Harmon1955", "MiddlemanGavis1961"),
    mark="C",
    place="d_jet/d_tube = sqrt(3)/2 laminar, sqrt(49/50) for a 1/7-power turbulent profile",
    ranges=(LAMINAR, TURBULENT),
    agreement="Middleman & Gavis measured an approach to 0.866 above a Reynolds number of 100 to "
    "150, 1 near 15 and 1.13 towards 0 [M]; no points were seen",
)


@physical(returns="length", velocity="velocity > 0")
def jet_diameter_laminar_pipe(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Diameter of the free jet from a long tube in laminar flow: sqrt(3)/2 of the tube's.

    Holds once the parabolic profile has become flat, which takes many diameters, for tubes long
    enough that the profile was parabolic, and at Reynolds numbers of 150 to 2000. The jet then
    runs at 4/3 of the mean speed in the tube. Short nozzles contract less, sharp orifices more.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    velocity : float or array
        Mean speed in the tube [m/s].
    nozzle_diameter : float or array
        Inner diameter of the tube [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside the Reynolds numbers 150 to 2000.

    Returns
    -------
    float or array
        Diameter of the jet [m].

    Raises
    ------
    OutOfRange
        For another Reynolds number, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``d_jet/d_tube = sqrt(3)/2 = 0.8660`` [C] by the balance of momentum and mass for a parabolic
    profile; the relaxation dissipates 1/9 of the kinetic energy. That it sets in above a
    Reynolds number of 100 to 150 is remembered [M].

    References
    ----------
    D. B. Harmon, J. Franklin Inst. 259 (1955) 519.
    S. Middleman, J. Gavis, Phys. Fluids 4 (1961) 355.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.jet_diameter_laminar_pipe(998.2, 1.0e-3, 9.0, '60 um'):.2f}")
    51.96 micrometer
    """
    reynolds = density * velocity * nozzle_diameter / viscosity
    mask = outside_mask("jet_diameter_laminar_pipe", outside, (reynolds, LAMINAR))
    # What only decides the range still passes its NaN and its shape on.
    result: float = blank_outside(_PARABOLA * nozzle_diameter + 0.0 * reynolds, mask)
    return result


@physical(returns="length", velocity="velocity > 0")
def jet_diameter_turbulent_pipe(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Diameter of the free jet from a long tube in turbulent flow: 0.990 of the tube's.

    Holds for a profile that follows the 1/7 power of the distance from the wall, at Reynolds
    numbers above 4000.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    velocity : float or array
        Mean speed in the tube [m/s].
    nozzle_diameter : float or array
        Inner diameter of the tube [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens at a Reynolds number below 4000.

    Returns
    -------
    float or array
        Diameter of the jet [m].

    Raises
    ------
    OutOfRange
        For a lower Reynolds number, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``d_jet/d_tube = sqrt(49/50) = 0.98995`` [C] by the balance of momentum and mass; the
    momentum factor of the profile is 50/49. No measured points were seen.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.jet_diameter_turbulent_pipe(998.2, 1.0e-3, 10.0, '1 mm'):.0f}")
    990 micrometer
    """
    reynolds = density * velocity * nozzle_diameter / viscosity
    mask = outside_mask("jet_diameter_turbulent_pipe", outside, (reynolds, TURBULENT))
    # What only decides the range still passes its NaN and its shape on.
    result: float = blank_outside(_SEVENTH_POWER * nozzle_diameter + 0.0 * reynolds, mask)
    return result
