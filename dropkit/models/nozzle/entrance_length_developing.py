"""Length of tube in which the profile of the speed develops."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["entrance_length_laminar", "entrance_length_turbulent"]

TURBULENT: Final = Range(4000.0, math.inf, "the Reynolds number of the hole", "")

MODEL: Final = Published(
    gives="length of tube in which the profile of the speed develops",
    holds="entry with even speed; far below a Reynolds number of 10 the laminar form is too short",
    sources=("WhiteFluidMechanics",),
    mark="S2",
    place="L/d = 0.06 Re laminar, 4.4 Re^(1/6) turbulent",
    ranges=(losses.LAMINAR, TURBULENT),
    agreement="no points were seen; by definition of its end, others put the laminar one between "
    "0.03 and 0.06 Re",
)


@physical(returns="distance", velocity="velocity > 0")
def entrance_length_laminar(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Length of tube in which a laminar profile develops.

    Holds up to a Reynolds number of 2100; a tube shorter than that has no parabolic profile.

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
        What happens above a Reynolds number of 2100.

    Returns
    -------
    float or array
        The length [m].

    Raises
    ------
    OutOfRange
        For a larger Reynolds number, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``L/d = 0.06 Re`` [S2].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.entrance_length_laminar('998 kg/m3', '1 mPa*s', '10 m/s', '60 um'):.2f}")
    2.16 millimeter
    """
    reynolds: Any = density * velocity * nozzle_diameter / viscosity
    mask = outside_mask("entrance_length_laminar", outside, (reynolds, losses.LAMINAR))
    result: float = blank_outside(0.06 * reynolds * nozzle_diameter, mask)
    return result


@physical(returns="distance", velocity="velocity > 0")
def entrance_length_turbulent(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Length of tube in which a turbulent profile develops.

    Holds above a Reynolds number of 4000.

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
        What happens below a Reynolds number of 4000.

    Returns
    -------
    float or array
        The length [m].

    Raises
    ------
    OutOfRange
        For a smaller Reynolds number, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``L/d = 4.4 Re^(1/6)`` [S2].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.entrance_length_turbulent('998 kg/m3', '1 mPa*s', '10 m/s', '1 mm'):.0f}")
    20 millimeter
    """
    reynolds: Any = density * velocity * nozzle_diameter / viscosity
    mask = outside_mask("entrance_length_turbulent", outside, (reynolds, TURBULENT))
    result: float = blank_outside(4.4 * reynolds ** (1.0 / 6.0) * nozzle_diameter, mask)
    return result
