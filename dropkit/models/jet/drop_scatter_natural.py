"""How much the drops of a natural jet differ: the least that the growth curve leaves open."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["least_drop_scatter_natural"]

OHNESORGE: Final = Range(0.0, 0.36, "the Ohnesorge number on the jet diameter", "")

MODEL: Final = Published(
    gives="least relative standard deviation of the drop diameters of a jet without drive",
    holds="natural breakup in the Rayleigh regime from disturbances of all wavelengths alike; a lower "
    "bound, without satellites, merging, or a jet whose speed wavers",
    sources=("AssetBales1951", "TrettelCompilation"),
    mark="C",
    place="sd(D)/D = (1/3) (8 C p)^(-1/2), p = 1 at Ohnesorge number 0",
    ranges=(OHNESORGE,),
    agreement="Asset & Bales 1951, 5 natural jets of 0.46 to 9.8 mm, Weber number 104 to 108: measured "
    "8.5, 10, 11, 21 and 33 % (10 and 11 from the two laminar ones), 2.3 to 8.8 times the bound of "
    "3.7 to 4.0 %",
)


@physical(returns="ratio", constant="ratio > 0")
def least_drop_scatter_natural(
    density: float,
    viscosity: float,
    surface_tension: float,
    jet_diameter: float,
    *,
    constant: float = 10.0,
    outside: Outside = "raise",
) -> float:
    """Least relative standard deviation of the drop diameters of a jet without drive.

    Holds as a lower bound: of disturbances of all wavelengths, those near the fastest-growing
    one win, but not only that one. Measured scatter of five natural jets was two to nine times
    as large (8.5 to 33 %). A drive removes it.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet [m].
    constant : float or array, keyword-only
        C, the logarithm of jet radius over initial disturbance [-]; 10 by default.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside Ohnesorge numbers up to 0.36.

    Returns
    -------
    float or array
        Standard deviation over mean diameter [-].

    Raises
    ------
    OutOfRange
        Outside that range, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    Disturbances of equal size at all wavelengths have grown by ``exp(w(x) t)`` at breakup, where
    ``w_max t = C``. About the maximum ``w = w_max (1 - 2 p (x/x_m - 1)^2)``, so that their power
    is a bell curve of ``x`` with ``sd(x)/x_m = (8 C p)^(-1/2)``; the drop goes as ``x^(-1/3)``
    [C, derived here]. From Weber's equation ``p = 1/(1 + 3 Oh)``, ``Oh`` on the diameter. No such
    formula was seen in print.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.least_drop_scatter_natural(998.2, 1.0e-3, 0.0727, 60e-6):.3f}")
    0.038
    """
    ohnesorge: Any = viscosity / (density * surface_tension * jet_diameter) ** 0.5
    mask = outside_mask("least_drop_scatter_natural", outside, (ohnesorge, OHNESORGE))
    spread: Any = (1.0 + 3.0 * ohnesorge) / constant
    result: float = blank_outside(spread**0.5 / (3.0 * math.sqrt(8.0)), mask)
    return result
