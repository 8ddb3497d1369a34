"""Speeds at which the flow in a tube ceases to be laminar and is surely turbulent."""

from __future__ import annotations

from typing import Any, Final, NamedTuple

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["TransitionVelocity", "transition_velocity"]

LAMINAR: Final = 2100.0
TURBULENT: Final = 4000.0

MODEL: Final = Published(
    gives="mean speeds between which the flow in a tube may be laminar or turbulent",
    holds="long tubes; a short smooth hole with a rounded entry can stay laminar far longer",
    sources=("WhiteFluidMechanics",),
    mark="S2",
    place="Reynolds numbers 2100 and 4000 as engineering pages quote them",
    agreement="quoted between 2000 and 2300 for the lower limit; no points were seen",
)


class TransitionVelocity(NamedTuple):
    """The two speeds of `transition_velocity`.

    Parameters
    ----------
    laminar_below : float, array or Quantity
        Below it the flow in a long tube is laminar [m/s].
    turbulent_above : float, array or Quantity
        Above it the flow in a long tube is turbulent [m/s].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> nozzle.transition_velocity(998.2, 1e-3, 1e-4).laminar_below < 22.0
    True
    """

    laminar_below: Any
    turbulent_above: Any


@physical(returns=("velocity", "velocity"))
def transition_velocity(
    density: float, viscosity: float, nozzle_diameter: float
) -> TransitionVelocity:
    """Mean speeds between which the flow in a long tube may be laminar or turbulent.

    Holds for long tubes. Turbulence roughens the jet and shortens it.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    nozzle_diameter : float or array
        Inner diameter of the tube [m].

    Returns
    -------
    TransitionVelocity
        ``laminar_below`` and ``turbulent_above`` [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    Reynolds numbers of 2100 and 4000 on the inner diameter [S2].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> found = nozzle.transition_velocity("998.2 kg/m3", "1 mPa*s", "100 um")
    >>> print(f"{found.laminar_below:.1f}, {found.turbulent_above:.1f}")
    21.0 meter / second, 40.1 meter / second
    """
    unit: Any = viscosity / (density * nozzle_diameter)
    return TransitionVelocity(LAMINAR * unit, TURBULENT * unit)
