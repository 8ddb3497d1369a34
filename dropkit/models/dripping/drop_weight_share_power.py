"""Share of the ideal drop weight that falls: the power law of Yildirim, Xu & Basaran 2005."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.dripping._factors import CURVES, WHAT, share
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["drop_weight_factor_power"]

RATIO: Final = Range(CURVES["power"].low, CURVES["power"].high, WHAT, "")

MODEL: Final = Published(
    gives="share of the ideal drop weight that falls from a tip",
    holds="drops that form slowly at a clean, circular tip; thin liquids",
    sources=("Yildirim2005", "HarkinsBrown1919"),
    mark="M+",
    place="rho g r^2/gamma = 3.60 phi^2.81",
    ranges=(RATIO,),
    agreement="within 1.1 % of the table of Harkins & Brown from 0.30 to 0.80; 2 to 5 % below its "
    "line under 0.30",
)


@physical(returns="ratio", tip_ratio="ratio > 0")
def drop_weight_factor_power(tip_ratio: float, *, outside: Outside = "raise") -> float:
    """Share of the ideal drop weight that falls from a tip, by Yildirim, Xu & Basaran.

    Holds from 0.1 to 0.8 here (their own limits are not remembered), for slow drops: computed from
    the equations of slender jets, not fitted to drop weights.

    Parameters
    ----------
    tip_ratio : float or array
        Radius of the tip over the cube root of the volume of the fallen drop [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside 0.1 to 0.8.

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
    ``rho g r^2/gamma = 3.60 phi^2.81``, so ``psi = 3.60/(2 pi) phi^-0.19`` [M+]: remembered, and
    within 1.1 % of the table of Harkins & Brown from 0.30 to 0.80.

    References
    ----------
    O. E. Yildirim, Q. Xu, O. A. Basaran, Phys. Fluids 17 (2005) 062107.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> round(dripping.drop_weight_factor_power(0.8), 4)
    0.5978
    """
    mask = outside_mask("drop_weight_factor_power", outside, (tip_ratio, RATIO))
    result: float = blank_outside(share(tip_ratio, CURVES["power"]), mask)
    return result
