"""Diameter of the jet from a long tube in laminar flow: swelling at low Reynolds number."""

from __future__ import annotations

from typing import Any, Final, NamedTuple

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside

__all__ = ["JetDiameter", "jet_diameter_laminar_tube"]

CONTRACTED: Final = 3.0**0.5 / 2.0
SWOLLEN: Final = 1.13
# Through 1 at a Reynolds number of 15 and within 1 % of its end at 150, both remembered.
MIDDLE: Final = 15.31
POWER: Final = 1.47
BAND: Final = 0.03

MODEL: Final = Published(
    gives="diameter of the jet from a long tube in laminar flow, with a band",
    holds="Newtonian liquid, parabolic profile at the end of the tube, surface tension and gravity "
    "small while it becomes flat",
    sources=("MiddlemanGavis1961", "Harmon1955"),
    mark="M",
    place="a curve of this project through three remembered marks: 1.13 towards a Reynolds number "
    "of 0, 1 at 15, 0.866 above 150",
    ranges=(losses.LAMINAR,),
    agreement="the end at high Reynolds number is a balance of momentum [C]; no points of Middleman "
    "& Gavis, nor the computed values of later authors, were seen",
)


class JetDiameter(NamedTuple):
    """Diameter of a jet with its band.

    Parameters
    ----------
    diameter : float, array or Quantity
        The estimate [m].
    low, high : float, array or Quantity
        Ends of the band [m].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> found = nozzle.jet_diameter_laminar_tube(998.2, 1e-2, 5.0, 60e-6)
    >>> found.low < found.diameter < found.high
    True
    """

    diameter: Any
    low: Any
    high: Any


@physical(returns=("length", "length", "length"), velocity="velocity > 0")
def jet_diameter_laminar_tube(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    *,
    outside: Outside = "raise",
) -> JetDiameter:
    """Diameter of the jet from a long tube in laminar flow at any Reynolds number, with a band.

    Holds for Newtonian liquids up to a Reynolds number of 2100, once the profile of the speed has
    become flat. Above 150 use the model of the family ``jet``, a balance of momentum; below it this
    one joins remembered marks, which is why it has a band.

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
    JetDiameter
        ``diameter``, ``low`` and ``high`` [m].

    Raises
    ------
    OutOfRange
        For a larger Reynolds number, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``d_jet/d = 0.866 + 0.264/(1 + (Re/15.3)^1.47)`` [M]: 1.13 in creeping flow (die swell), 1 at
    15, within 1 % of sqrt(3)/2 above 150. The band, 3 % either way, is a judgement. Elastic
    liquids swell far more.

    References
    ----------
    S. Middleman, J. Gavis, Phys. Fluids 4 (1961) 355, from memory.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> found = nozzle.jet_diameter_laminar_tube("1100 kg/m3", "10 mPa*s", "6 m/s", "60 um")
    >>> print(f"{found.diameter:.1f}, {found.low:.1f} to {found.high:.1f}")
    55.1 micrometer, 53.4 micrometer to 56.8 micrometer
    """
    reynolds: Any = density * velocity * nozzle_diameter / viscosity
    mask = outside_mask("jet_diameter_laminar_tube", outside, (reynolds, losses.LAMINAR))
    swell = (SWOLLEN - CONTRACTED) / (1.0 + (reynolds / MIDDLE) ** POWER)
    d = blank_outside(nozzle_diameter * (CONTRACTED + swell), mask)
    return JetDiameter(d, d * (1.0 - BAND), d * (1.0 + BAND))
