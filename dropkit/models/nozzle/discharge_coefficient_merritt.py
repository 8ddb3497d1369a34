"""Discharge coefficient of short tubes in laminar flow, as Merritt gives it."""

from __future__ import annotations

from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside

__all__ = ["discharge_coefficient_short_tube"]

BRANCH: Final = 50.0

MODEL: Final = Published(
    gives="discharge coefficient of a short tube in laminar flow",
    holds="sharp entry, laminar flow in the tube",
    sources=("Merritt1967",),
    mark="S2",
    place="eqs. 2.40 and 2.41 of the textbook that quotes it",
    ranges=(losses.LAMINAR,),
    agreement="no points were seen; at the branch, Re d/L = 50, the two forms differ by 1.7 %",
)


@physical(returns="ratio", velocity="velocity > 0")
def discharge_coefficient_short_tube(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Discharge coefficient of a short tube in laminar flow, shown beside the others.

    Holds for a sharp entry and a Reynolds number up to 2100. It steps by 1.7 % where its two
    branches meet, so that no pressure is computed from it.

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
    nozzle_length : float or array
        Length of the tube [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above a Reynolds number of 2100.

    Returns
    -------
    float or array
        Flow over that of a loss-free jet as wide as the tube [-].

    Raises
    ------
    OutOfRange
        For a larger Reynolds number, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Cd = (1.5 + 13.74 sqrt(L/(Re d)))^(-1/2)`` where ``Re d/L`` is above 50, ``Cd = (2.28 + 64
    L/(Re d))^(-1/2)`` below [S2].

    References
    ----------
    H. E. Merritt, Hydraulic Control Systems, Wiley 1967, as quoted in a textbook.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.discharge_coefficient_short_tube(998.2, 1e-3, 12.0, 60e-6, 300e-6):.3f}")
    0.615
    """
    reynolds: Any = density * velocity * nozzle_diameter / viscosity
    mask = outside_mask("discharge_coefficient_short_tube", outside, (reynolds, losses.LAMINAR))
    x: Any = nozzle_length / (nozzle_diameter * reynolds)
    developing, developed = 1.5 + 13.74 * x**0.5, 2.28 + 64.0 * x
    loss: Any
    if isinstance(x, np.ndarray):
        loss = np.where(x * BRANCH < 1.0, developing, developed)
    else:
        loss = developing if x * BRANCH < 1.0 else developed
    result: float = blank_outside(loss**-0.5, mask)
    return result
