"""Share of the ideal drop weight that falls: the quadratic form of Heertjes et al. 1971."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.dripping._factors import CURVES, WHAT, share
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["drop_weight_factor_quadratic"]

RATIO: Final = Range(CURVES["quadratic"].low, CURVES["quadratic"].high, WHAT, "")

MODEL: Final = Published(
    gives="share of the ideal drop weight that falls from a tip",
    holds="drops that form slowly at a clean, circular tip; thin liquids",
    sources=("Heertjes1971", "HarkinsBrown1919"),
    mark="S2",
    place="F = 0.14782 + 0.27896 phi - 0.1662 phi^2, psi = 1/(2 pi F)",
    ranges=(RATIO,),
    agreement="within 1.3 % of the table of Harkins & Brown, within 0.6 % from 0.40 up",
)


@physical(returns="ratio", tip_ratio="ratio > 0")
def drop_weight_factor_quadratic(tip_ratio: float, *, outside: Outside = "raise") -> float:
    """Share of the ideal drop weight that falls from a tip, by Heertjes et al.

    Holds from 0.3 to 1.2, for slow drops of thin liquids; a fit to the table of Harkins & Brown.

    Parameters
    ----------
    tip_ratio : float or array
        Radius of the tip over the cube root of the volume of the fallen drop [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside 0.3 to 1.2.

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
    ``psi = 1/(2 pi F)``, ``F = 0.14782 + 0.27896 phi - 0.1662 phi^2`` [S2].

    References
    ----------
    P. M. Heertjes et al., Chem. Eng. Sci. 26 (1971).

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> round(dripping.drop_weight_factor_quadratic(0.85), 4)
    0.6009
    """
    mask = outside_mask("drop_weight_factor_quadratic", outside, (tip_ratio, RATIO))
    result: float = blank_outside(share(tip_ratio, CURVES["quadratic"]), mask)
    return result
