"""Breakup length of a very viscous jet that gravity has stretched: Javadi et al. 2013."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["stretched_viscous_breakup_length"]

# (9/2)^(4/3) 2^(1/3) pi^(-2/3): from growth at gamma/(6 mu a) along a jet in free fall.
FACTOR: Final = 4.5 ** (4.0 / 3.0) * 2.0 ** (1.0 / 3.0) * math.pi ** (-2.0 / 3.0)

MODEL: Final = Published(
    gives="breakup length of a very viscous jet stretched by gravity, in the limit",
    holds="a jet straight downwards whose speed at breakup far exceeds that at the nozzle, with an "
    "Ohnesorge number far above 1 all along",
    sources=("Javadi2013",),
    mark="S",
    place="L ~ (g Q^2 mu^4/gamma^4)^(1/3)",
    agreement="the abstract calls the agreement of its theory with measured lengths good, except for "
    "very long jets; it prints no constant and no points: the constant here is derived [C]",
)


@physical(returns="distance", constant="ratio > 0", gravity="acceleration > 0")
def stretched_viscous_breakup_length(
    viscosity: float,
    surface_tension: float,
    flow: float,
    *,
    constant: float = 10.0,
    gravity: float = 9.80665,
) -> float:
    """Breakup length of a very viscous jet that gravity has stretched thin.

    Holds as a limit: speed at breakup far above that at the nozzle, Ohnesorge number far above
    1. The dependence is published; its constant was not seen and is an estimate.

    Parameters
    ----------
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    flow : float or array
        Volume flow of the jet [m3/s].
    constant : float or array, keyword-only
        C, the logarithm of radius over initial disturbance [-]; 10 by default, as for
        `natural_breakup_length`.
    gravity : float or array, keyword-only
        Acceleration along the jet [m/s2]; 9.80665 by default.

    Returns
    -------
    float or array
        The breakup length [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``L = 4.364 C^(4/3) (g Q^2 mu^4/gamma^4)^(1/3)``: the group is published [S, abstract]; the
    factor follows here [C] from growth at the rate ``gamma/(6 mu a)`` of very long waves along a
    jet in free fall from rest, ``C = integral of w dz/U``. Density does not enter. With C = 10 the
    factor is 94; a factor 2.4 in C is one of 3.2 in length. `gravity_thinned_breakup_length` tends
    to this.

    References
    ----------
    A. Javadi et al., Phys. Rev. Lett. 110 (2013) 144501.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.stretched_viscous_breakup_length('0.5 Pa*s', '60 mN/m', '20 mL/min'):.0f}")
    163 millimeter
    """
    group: Any = gravity * flow * flow * (constant * viscosity / surface_tension) ** 4
    result: float = FACTOR * group ** (1.0 / 3.0)
    return result
