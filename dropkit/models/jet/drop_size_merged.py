"""Drops that several drops merge into: conservation of volume and momentum."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["drops_to_merge", "merged_drop_diameter"]

MODEL: Final = Published(
    gives="diameter of a drop made of several equal ones, and how many it takes",
    holds="equal drops that merge without splashing off or losing anything on the way",
    sources=(),
    mark="C",
    place="D_n = n^(1/3) D",
    agreement="conservation of volume; exact where all n merge",
)


@physical(returns="length", count="ratio > 0")
def merged_drop_diameter(drop_diameter: float, count: float) -> float:
    """Diameter of the drop that several equal drops merge into.

    Holds where all of them merge: in a modulated stream, or where each second drop catches up.
    The rate of drops falls by the same count.

    Parameters
    ----------
    drop_diameter : float or array
        Diameter of one drop [m].
    count : float or array
        How many merge [-]; a mean count need not be whole.

    Returns
    -------
    float or array
        Diameter of the merged drop [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``D_n = n^(1/3) D`` [C]: conservation of volume. Whether and where drops merge is not part of
    this: it takes a difference of their speeds.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.merged_drop_diameter('110 um', 2):.1f}")
    138.6 micrometer
    """
    growth: Any = count ** (1.0 / 3.0)
    result: float = drop_diameter * growth
    return result


@physical(returns="ratio", merged_diameter="length > 0")
def drops_to_merge(drop_diameter: float, merged_diameter: float) -> float:
    """How many equal drops it takes to make a drop of a given diameter.

    The inverse of `merged_drop_diameter`. A result that is not whole means that a stream of one
    size can't make that drop by merging.

    Parameters
    ----------
    drop_diameter : float or array
        Diameter of one drop [m].
    merged_diameter : float or array
        Diameter of the merged drop [m].

    Returns
    -------
    float or array
        The count [-].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``n = (D_n/D)^3`` [C].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.drops_to_merge('110 um', '138.6 um'):.2f}")
    2.00
    """
    return (merged_diameter / drop_diameter) ** 3
