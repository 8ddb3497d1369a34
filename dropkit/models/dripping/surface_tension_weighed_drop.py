"""Surface tension from the weight of a drop: the drop weight method."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.dripping._factors import Factor, statement, tension_of_volume
from dropkit.models.published import Published
from dropkit.validity import Outside

__all__ = ["surface_tension_drop_weight"]

MODEL: Final[Published] = statement(
    "surface tension from a weighed drop", place="gamma = m g/(2 pi r psi), psi(r/V^(1/3))"
)


@physical(returns="surface_tension", gravity="acceleration > 0")
def surface_tension_drop_weight(
    density: float,
    mass: float,
    tip_diameter: float,
    gravity: float = 9.80665,
    *,
    factor: Factor = "table",
    outside: Outside = "raise",
) -> float:
    """Surface tension of a liquid from the mass of a drop that fell slowly from a known tip.

    Holds for drops of a minute each, for 1 %: faster ones are heavier, and make the tension too
    high by as much. Weigh many drops, and count their satellites in. Liquids with surfactants
    show the tension that a drop's age allows.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    mass : float or array
        Mass of one drop [kg].
    tip_diameter : float or array
        Diameter of the circle that the drop hung from [m].
    gravity : float or array
        Acceleration of gravity [m/s2].
    factor : {"table", "quadratic", "polynomial", "power"}, keyword-only
        The published curve of the drop weight factor.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside the range of that curve.

    Returns
    -------
    float or array
        Surface tension [N/m].

    Raises
    ------
    OutOfRange
        For a tip too wide for such a drop, unless `outside` says otherwise.
    BadInput
        For another word for `factor`.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``gamma = m g/(2 pi r psi(phi))`` with ``phi = r/V^(1/3)``, ``V = m/rho``: no equation to solve.
    In the other common notation ``gamma = (m g/r) F``, ``F = 1/(2 pi psi)``.

    References
    ----------
    W. D. Harkins, F. E. Brown, J. Am. Chem. Soc. 41 (1919) 499.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.surface_tension_drop_weight(998.207, '47.42 mg', '3 mm'):.2f}")
    72.74 millinewton / meter
    """
    result: float = tension_of_volume(
        "surface_tension_drop_weight",
        density,
        mass / density,
        tip_diameter,
        gravity,
        factor,
        outside,
    )
    return result
