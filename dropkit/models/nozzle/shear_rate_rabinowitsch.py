"""Shear rate at the wall of a tube, Newtonian and power-law liquids."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["wall_shear_rate"]

MODEL: Final = Published(
    gives="shear rate at the wall of a tube",
    holds="developed laminar flow without slip; Newtonian or power-law liquid",
    sources=(),
    mark="C",
    place="8U/d (3n + 1)/(4n)",
    agreement="exact for the profile of a power-law liquid",
)


@physical(returns="shear_rate", velocity="velocity > 0", flow_index="ratio > 0")
def wall_shear_rate(velocity: float, nozzle_diameter: float, *, flow_index: float = 1.0) -> float:
    """Shear rate at the wall of a tube, what a thickened or delicate liquid goes through.

    Holds for developed laminar flow; near the entry and in turbulent flow it is higher.

    Parameters
    ----------
    velocity : float or array
        Mean speed in the tube [m/s].
    nozzle_diameter : float or array
        Inner diameter of the tube [m].
    flow_index : float or array, keyword-only
        Exponent n of the power law, stress = K (shear rate)^n: 1 for a Newtonian liquid, below 1
        for one that thins under shear [-].

    Returns
    -------
    float or array
        The shear rate [1/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``8U/d (3n + 1)/(4n)`` [C].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.wall_shear_rate('10 m/s', '60 um', flow_index=0.5):.0f}")
    1666667 / second
    """
    apparent: Any = 8.0 * velocity / nozzle_diameter
    result: float = apparent * (3.0 * flow_index + 1.0) / (4.0 * flow_index)
    return result
