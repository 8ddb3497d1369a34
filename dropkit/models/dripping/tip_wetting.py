"""The circle that a drop hangs from: outer or inner edge of a tip, by whether the liquid wets it."""

from __future__ import annotations

from typing import Final

import numpy as np

from dropkit.boundary import physical
from dropkit.errors import BadInput, Unphysical
from dropkit.models.published import Published

__all__ = ["wetted_tip_diameter"]

MODEL: Final = Published(
    gives="diameter of the circle that a drop hangs from",
    holds="level, round tips with a sharp outer edge; between wetting and not, a drop may hang from "
    "anywhere on the face, and a liquid may also climb the outside of the tube",
    sources=("HarkinsBrown1919", "Eschbaum1895"),
    mark="S",
    place="Bulletin of Pharmacy 9 (1895) 461: the outer circumference; mercury, the opening",
    agreement="Eschbaum's rule for glass tips: the outer edge for every liquid but mercury, where the "
    "opening counts; no points of tips that are half wetted were seen",
)


@physical(returns="length")
def wetted_tip_diameter(
    nozzle_diameter: float, outer_diameter: float, *, wets: bool = True
) -> float:
    """Diameter of the circle that a drop hangs from: outer edge of a wetted tip, else the bore.

    Holds for level, round tips with a sharp edge. Whether a liquid wets the face is a matter of
    the pair and of cleanliness: water wets clean glass and steel, and not wax or fluoropolymer.

    Parameters
    ----------
    nozzle_diameter : float or array
        Inner diameter of the tip [m].
    outer_diameter : float or array
        Outer diameter of the tip [m].
    wets : bool, keyword-only
        Whether the liquid wets the face of the tip; it does by default.

    Returns
    -------
    float or array
        The diameter [m].

    Raises
    ------
    Unphysical
        Where the outer diameter is not larger than the inner one.
    BadInput
        For a `wets` that is neither true nor false.
    UnitError
        An argument of another dimension.

    Notes
    -----
    Eschbaum found that the outer circumference decides, with glass tips and every liquid but
    mercury [S].

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.wetted_tip_diameter('0.6 mm', '3 mm').to('mm'):.1f}")
    3.0 millimeter
    >>> print(f"{dripping.wetted_tip_diameter('0.6 mm', '3 mm', wets=False).to('mm'):.1f}")
    0.6 millimeter
    """
    if not isinstance(wets, (bool, np.bool_)):
        raise BadInput(f"wets={wets!r} is neither true nor false", allowed="True or False")
    # NaN in either passes, and comes out.
    if bool(np.any(outer_diameter <= nozzle_diameter)):
        raise Unphysical(
            "an outer diameter is not larger than the inner one",
            allowed="outer_diameter > nozzle_diameter",
            hint="A tip with a sharp rim has but one diameter: use it as tip_diameter",
        )
    if wets:
        return outer_diameter + 0.0 * nozzle_diameter
    return nozzle_diameter + 0.0 * outer_diameter
