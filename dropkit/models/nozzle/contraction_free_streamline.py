"""Area of the jet from a sharp edge over that of the hole: free-streamline theory."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["contraction_coefficient_orifice"]

HOLE: Final = Range(0.0, 1.0 - 1e-6, "the diameter of the hole over that of the pipe", "")

MODEL: Final = Published(
    gives="area of the jet from a sharp-edged hole over that of the hole, in a pipe of any width",
    holds="high Reynolds number, sharp edge; derived for slots, used for round holes",
    sources=("Merritt1967", "Britannica1911"),
    mark="S2",
    place="Cc {1 + (2/pi) (D/(Cc d) - Cc d/D) atan(Cc d/D)} = 1 as a textbook quotes Merritt",
    ranges=(HOLE,),
    agreement="pi/(pi + 2) = 0.611 for a wide pipe; discharge coefficients measured with water "
    "(1911, 11 points at 12.7 mm) are 0.603 to 0.620, the area itself was then put at 0.64",
)


@physical(returns="ratio", pipe_diameter="length > 0")
def contraction_coefficient_orifice(
    nozzle_diameter: float, pipe_diameter: float, *, outside: Outside = "raise"
) -> float:
    """Area of the jet from a sharp-edged hole over that of the hole, in a pipe of any width.

    Holds at high Reynolds number for a sharp edge; a rounded one contracts far less.

    Parameters
    ----------
    nozzle_diameter : float or array
        Diameter of the hole [m].
    pipe_diameter : float or array
        Diameter of the pipe or chamber ahead of it [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens for a hole as wide as the pipe or wider.

    Returns
    -------
    float or array
        Area of the jet over that of the hole [-]; its root is the ratio of the diameters.

    Raises
    ------
    OutOfRange
        For a hole as wide as the pipe, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    With ``s = Cc d/D`` the quoted equation is ``d/D = s + (2/pi) (1 - s^2) atan(s)``, which rises
    from 0 to 1 with s: one root, found by Newton's method inside a bracket.

    References
    ----------
    H. E. Merritt, Hydraulic Control Systems, Wiley 1967, as quoted in a textbook.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> for pipe in ("20 mm", "0.2 mm"):
    ...     print(f"{nozzle.contraction_coefficient_orifice('0.1 mm', pipe):.3f}")
    0.611
    0.644
    """
    beta: Any = nozzle_diameter / pipe_diameter
    mask = outside_mask("contraction_coefficient_orifice", outside, (beta, HOLE))

    def excess(y: Any) -> tuple[Any, Any]:
        s = losses.exponential(y)
        turn = 2.0 / math.pi * np.arctan(s)
        value = s + (1.0 - s * s) * turn
        slope = 1.0 + 2.0 / math.pi * (1.0 - s * s) / (1.0 + s * s) - 2.0 * s * turn
        return value - beta, slope * s

    start = losses.logarithm(math.pi / (math.pi + 2.0) * beta)
    found = losses.exponential(losses.increasing_root(excess, start)) / beta
    # Beyond a hole as wide as the pipe there is no jet to speak of.
    if isinstance(beta, np.ndarray):
        found = np.where(beta < 1.0, found, np.nan)
    elif not beta < 1.0:
        found = math.nan
    result: float = blank_outside(found, mask)
    return result
