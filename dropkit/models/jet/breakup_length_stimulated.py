"""Breakup length of a driven jet from its growth rate and the disturbance it starts with."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["stimulated_breakup_length"]

LINEAR: Final = Range(0.0, 0.2, "the radius amplitude over the jet radius", "")

MODEL: Final = Published(
    gives="breakup length of a driven jet",
    holds="small waves (amplitude below a fifth of the radius) that grow at one rate until they cut "
    "the jet; speed far above that of capillary waves",
    sources=("Weber1931", "Sterling1969", "TrettelCompilation"),
    mark="C",
    place="L = U ln(a/eps0)/w",
    ranges=(LINEAR,),
    agreement="with one disturbance level, ln(a/eps0) = 15.2, and the gas's part in the growth rate, "
    "the compared rows of Sterling 1969 lie within 15 %; driven jets: no points were seen",
)


@physical(
    returns="distance",
    velocity="velocity > 0",
    growth_rate="growth_rate > 0",
    radius_amplitude="length > 0",
)
def stimulated_breakup_length(
    velocity: float,
    jet_diameter: float,
    growth_rate: float,
    radius_amplitude: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Breakup length of a driven jet from growth rate and initial disturbance of its RADIUS.

    Holds for small waves that grow at one rate all the way. The amplitude is that of the jet's
    radius at the nozzle, in metres: a modulation of the speed or the pressure is another thing
    and starts smaller.

    Parameters
    ----------
    velocity : float or array
        Speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet [m].
    growth_rate : float or array
        Growth rate of the wave that the drive makes [1/s].
    radius_amplitude : float or array
        Amplitude of the initial disturbance of the jet's radius [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens for an amplitude above 0.2 of the radius, where growth is no longer linear.

    Returns
    -------
    float or array
        The breakup length [m].

    Raises
    ------
    OutOfRange
        For a larger amplitude, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``L = U ln(a/eps0)/w`` [C], ``a`` the radius of the jet, ``eps0`` the amplitude. An amplitude
    as large as the radius or larger leaves no jet to break: NaN, with one warning. The logarithm
    is not a constant of nature: from natural jets it came out between 6 and 23, and one tenth of
    the amplitude adds 2.3 to it.

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> growth = jet.maximum_growth_inviscid(998.2, 0.0727, 60e-6)
    >>> print(f"{jet.stimulated_breakup_length('10 m/s', '60 um', growth, '30 nm'):.2f}")
    3.87 millimeter
    """
    ratio: Any = 2.0 * radius_amplitude / jet_diameter
    mask = outside_mask("stimulated_breakup_length", outside, (ratio, LINEAR))
    # Powers don't give a logarithm, so floats and arrays part here. Without a logarithm above
    # zero there is no length: the boundary warns of the NaN.
    folds: Any
    if isinstance(ratio, np.ndarray):
        folds = np.where(ratio < 1.0, -np.log(ratio), np.nan)
    else:
        folds = -math.log(ratio) if ratio < 1.0 else math.nan
    result: float = blank_outside(velocity * folds / growth_rate, mask)
    return result
