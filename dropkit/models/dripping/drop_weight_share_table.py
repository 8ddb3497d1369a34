"""Share of the ideal drop weight that falls: the table of Harkins & Brown 1919."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.dripping._factors import CURVES, WHAT, share
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["drop_weight_factor"]

RATIO: Final = Range(CURVES["table"].low, CURVES["table"].high, WHAT, "")

MODEL: Final = Published(
    gives="share of the ideal drop weight that falls from a tip",
    holds="drops that form slowly at a clean, circular tip; thin liquids",
    sources=("HarkinsBrown1919", "Rayleigh1899", "WilkinsonAronson1973"),
    mark="M+",
    place="table of psi against r/V^(1/3), straight between its entries",
    ranges=(RATIO,),
    agreement="Rayleigh 1899, 7 slow water drops, 0.45 to 1.13: bias -0.1 %, rms 1.0 %, largest "
    "1.5 %; mercury agreed where psi is 0.61 to 0.72 (an abstract)",
)


@physical(returns="ratio", tip_ratio="ratio > 0")
def drop_weight_factor(tip_ratio: float, *, outside: Outside = "raise") -> float:
    """Share of the ideal drop weight that falls from a tip, by the table of Harkins & Brown.

    Holds for drops that form slowly (a minute each, for 1 %) at clean, circular tips, thin liquids.
    Measurements began at a ratio of 0.30; below it a straight line leads to the limit 1, and other
    published curves lie up to 5 % lower.

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
    Table of 19 entries from 0.30 to 1.20 [M+]: remembered, and within 1.5 % of seven drop weights
    of Rayleigh that were seen. psi falls to 0.599 at 0.85 and rises again. In the other common
    notation ``F = 1/(2 pi psi)``. Mercury agrees where psi is 0.61 to 0.72, but not with what
    others measured above 0.72 (an abstract).

    References
    ----------
    W. D. Harkins, F. E. Brown, J. Am. Chem. Soc. 41 (1919) 499.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> round(dripping.drop_weight_factor(0.85), 4)
    0.5992
    """
    mask = outside_mask("drop_weight_factor", outside, (tip_ratio, RATIO))
    result: float = blank_outside(share(tip_ratio, CURVES["table"]), mask)
    return result
