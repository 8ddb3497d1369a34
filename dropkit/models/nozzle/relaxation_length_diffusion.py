"""Distance over which the profile of the speed in a free jet becomes flat: viscous diffusion."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.published import Published

__all__ = ["profile_relaxation_length"]

# First zero of the Bessel function J1 [C].
ZERO: Final = 3.8317059702075123

MODEL: Final = Published(
    gives="distance over which the profile of the speed in a free jet becomes flat",
    holds="laminar jet from a long tube at a Reynolds number far above 1, gas without drag",
    sources=(),
    mark="C",
    place="exp(-j^2 nu t/a^2), j = 3.8317 the first zero of J1, carried along at the mean speed",
    agreement="checked against the diffusion of a parabola by finite differences, to 1 %; no "
    "measured points were seen",
)


@physical(returns="distance", velocity="velocity > 0", remaining="fraction")
def profile_relaxation_length(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    *,
    remaining: float = 0.01,
) -> float:
    """Distance over which the profile of the speed in a free jet becomes flat.

    Holds for laminar jets from long tubes. Within it the jet contracts towards its final diameter,
    and waves grow otherwise than on a jet of even speed.

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
    remaining : float or array, keyword-only
        Part of the unevenness that is left, 0.01 by default [-].

    Returns
    -------
    float or array
        The distance from the tube [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``L = d Re ln(1/remaining)/(4 j^2) = 0.0170 d Re ln(1/remaining)`` [C], the slowest mode of a
    jet without friction at its surface; ``U a^2`` is the same before and after the contraction.
    For 0.01 that is 0.078 d Re.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.profile_relaxation_length('998 kg/m3', '1 mPa*s', '10 m/s', '60 um'):.2f}")
    2.82 millimeter
    """
    reynolds: Any = density * velocity * nozzle_diameter / viscosity
    folds = -losses.logarithm(remaining)
    result: float = nozzle_diameter * reynolds * folds / (4.0 * ZERO * ZERO)
    return result
