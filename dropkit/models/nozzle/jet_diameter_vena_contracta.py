"""Diameter of the jet from a sharp-edged hole in a thin plate."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.nozzle.jet_diameter_swell import JetDiameter
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["jet_diameter_sharp_orifice"]

FAST: Final = Range(2000.0, math.inf, "the Reynolds number of the hole", "")
AREA: Final = (0.62, 0.61, 0.64)

MODEL: Final = Published(
    gives="diameter of the jet from a sharp-edged hole in a thin plate, with a band",
    holds="sharp edge, plate thinner than half a diameter, high Reynolds number",
    sources=("Britannica1911", "Merritt1967"),
    mark="S2",
    place="area ratio 0.61 to 0.64: pi/(pi + 2) = 0.611 by free streamlines, 0.64 measured as "
    "quoted in 1911",
    ranges=(FAST,),
    agreement="areas between 0.61 and 0.64 cover what was seen; that they hold down to a Reynolds "
    "number of 2000 is a judgement. Below, the jet contracts less",
)


@physical(returns=("length", "length", "length"), velocity="velocity > 0")
def jet_diameter_sharp_orifice(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    *,
    outside: Outside = "raise",
) -> JetDiameter:
    """Diameter of the jet from a sharp-edged hole in a thin plate, with a band.

    Holds above a Reynolds number of about 2000, one hole diameter or less behind the plate.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    velocity : float or array
        Mean speed in the hole, flow over its area [m/s].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens at a lower Reynolds number.

    Returns
    -------
    JetDiameter
        ``diameter``, ``low`` and ``high`` [m].

    Raises
    ------
    OutOfRange
        For a lower Reynolds number, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    Roots of the area ratios 0.62, 0.61 and 0.64 [S2]: 0.787 of the hole, from 0.781 to 0.800.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> found = nozzle.jet_diameter_sharp_orifice("998 kg/m3", "1 mPa*s", "15 m/s", "0.3 mm")
    >>> print(f"{found.diameter:.0f}, {found.low:.0f} to {found.high:.0f}")
    236 micrometer, 234 micrometer to 240 micrometer
    """
    reynolds: Any = density * velocity * nozzle_diameter / viscosity
    mask = outside_mask("jet_diameter_sharp_orifice", outside, (reynolds, FAST))
    # What only decides the range still passes its NaN and its shape on.
    d = blank_outside(nozzle_diameter + 0.0 * reynolds, mask)
    return JetDiameter(*(d * math.sqrt(area) for area in AREA))
