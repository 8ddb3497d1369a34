"""Share of the ideal drop weight that falls: the polynomial of Lee, Chan & Pogaku 2008."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.dripping._factors import CURVES, WHAT, share
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["drop_weight_factor_polynomial"]

RATIO: Final = Range(CURVES["polynomial"].low, CURVES["polynomial"].high, WHAT, "")

MODEL: Final = Published(
    gives="share of the ideal drop weight that falls from a tip",
    holds="drops that form slowly at a clean, circular tip; thin liquids",
    sources=("LeeChanPogaku2008", "HarkinsBrown1919"),
    mark="M+",
    place="psi = 1 - 0.9121 phi - 2.109 phi^2 + 13.38 phi^3 - ... + 2.593 phi^7",
    ranges=(RATIO,),
    agreement="within 1.3 % of the table of Harkins & Brown; its authors ask for more work at small "
    "ratios",
)


@physical(returns="ratio", tip_ratio="ratio > 0")
def drop_weight_factor_polynomial(tip_ratio: float, *, outside: Outside = "raise") -> float:
    """Share of the ideal drop weight that falls from a tip, by Lee, Chan & Pogaku.

    Holds from 0 to 1.2, for slow drops of thin liquids; the fit that a critical review proposes.

    Parameters
    ----------
    tip_ratio : float or array
        Radius of the tip over the cube root of the volume of the fallen drop [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside 0 to 1.2.

    Returns
    -------
    float or array
        psi: the weight of the drop over ``2 pi r gamma`` [-].

    Raises
    ------
    OutOfRange
        Outside that range, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    drop_weight_factors_compared : All published curves side by side.

    Notes
    -----
    ``psi = 1.000 - 0.9121 phi - 2.109 phi^2 + 13.38 phi^3 - 27.29 phi^4 + 27.53 phi^5
    - 13.58 phi^6 + 2.593 phi^7`` [M+]: remembered, and within 1.3 % of the table.

    References
    ----------
    B.-B. Lee, E.-S. Chan, R. Pogaku, Chem. Eng. Commun. 195 (2008) 889.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> round(dripping.drop_weight_factor_polynomial(0.85), 4)
    0.5971
    """
    mask = outside_mask("drop_weight_factor_polynomial", outside, (tip_ratio, RATIO))
    result: float = blank_outside(share(tip_ratio, CURVES["polynomial"]), mask)
    return result
