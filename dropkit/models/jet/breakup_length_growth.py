"""Breakup length from a growth rate and the disturbance that a jet starts with, and back."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["breakup_length_from_growth", "radius_amplitude_from_breakup_length"]

LINEAR: Final = Range(0.0, 0.2 * (1.0 + 1e-12), "the radius amplitude over the jet radius", "")

MODEL: Final = Published(
    gives="breakup length from any growth rate and an initial amplitude of the radius, and back",
    holds="small waves (amplitude below a fifth of the radius) that grow at one rate until they cut "
    "the jet; speed far above that of capillary waves",
    sources=("Weber1931", "Sterling1969", "TrettelCompilation"),
    mark="C",
    place="L = U ln(a/eps0)/w",
    ranges=(LINEAR,),
    agreement="Sterling 1969, sharp orifice, 21 rows: all within 14 % with one disturbance level, "
    "ln(a/eps0) = 15.2, and the gas's part in the growth rate (C = 0.175)",
)


@physical(
    returns="distance",
    velocity="velocity > 0",
    growth_rate="growth_rate > 0",
    radius_amplitude="length > 0",
)
def breakup_length_from_growth(
    velocity: float,
    jet_diameter: float,
    growth_rate: float,
    radius_amplitude: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Breakup length from a growth rate and the initial amplitude of the jet's radius.

    Holds for small waves that grow at one rate all the way. The growth rate may come from any
    relation: inviscid, viscous, with gas, in a second liquid.

    Parameters
    ----------
    velocity : float or array
        Speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet [m].
    growth_rate : float or array
        Growth rate of the wave that cuts the jet [1/s].
    radius_amplitude : float or array
        Amplitude, middle to crest, of the growing wave of the jet's radius at the nozzle [m].
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
    is not a constant of nature: from natural jets it came out between 5 and 25, and one tenth of
    the amplitude adds 2.3 to it.

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> growth = jet.maximum_growth_inviscid(998.2, 0.0727, 60e-6)
    >>> print(f"{jet.breakup_length_from_growth('10 m/s', '60 um', growth, '30 nm'):.2f}")
    3.87 millimeter
    """
    ratio: Any = 2.0 * radius_amplitude / jet_diameter
    mask = outside_mask("breakup_length_from_growth", outside, (ratio, LINEAR))
    # Powers don't give a logarithm, so floats and arrays part here. Without a logarithm above
    # zero there is no length: the boundary warns of the NaN.
    folds: Any
    if isinstance(ratio, np.ndarray):
        folds = np.where(ratio < 1.0, -np.log(ratio), np.nan)
    else:
        folds = -math.log(ratio) if ratio < 1.0 else math.nan
    result: float = blank_outside(velocity * folds / growth_rate, mask)
    return result


@physical(
    returns="length",
    velocity="velocity > 0",
    growth_rate="growth_rate > 0",
)
def radius_amplitude_from_breakup_length(
    velocity: float, jet_diameter: float, growth_rate: float, breakup_length: float
) -> float:
    """Initial amplitude of the jet's radius that explains a measured breakup length.

    The inverse of `breakup_length_from_growth`: what a rig's disturbance or drive amounts to.

    Parameters
    ----------
    velocity : float or array
        Speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet [m].
    growth_rate : float or array
        Growth rate of the wave that cuts the jet [1/s].
    breakup_length : float or array
        Length of the jet from the nozzle to where it breaks [m].

    Returns
    -------
    float or array
        Amplitude of the growing wave of the jet's radius at the nozzle [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``eps0 = a exp(-w L/U)`` [C]. An error of the growth rate enters its exponent, so that the
    amplitude is that of the growth rate it was found with, and of no other. A result above a
    fifth of the radius means that growth was not linear.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> growth = jet.maximum_growth_inviscid(998.2, 0.0727, 60e-6)
    >>> start = jet.radius_amplitude_from_breakup_length("10 m/s", "60 um", growth, "3.87 mm")
    >>> print(f"{start.to('nm'):.0f}")
    30 nanometer
    """
    folds: Any = growth_rate * breakup_length / velocity
    shrunk: Any = np.exp(-folds) if isinstance(folds, np.ndarray) else math.exp(-folds)
    result: float = 0.5 * jet_diameter * shrunk
    return result
