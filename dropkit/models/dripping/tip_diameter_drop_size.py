"""The tip for a wanted drop: the drop weight, solved for the radius."""

from __future__ import annotations

import math
from typing import Final

from dropkit.boundary import physical
from dropkit.models.dripping._factors import Factor, statement, tip_of_volume
from dropkit.models.published import Published
from dropkit.validity import Outside

__all__ = ["tip_diameter_for_drop"]

MODEL: Final[Published] = statement(
    "diameter of the tip that drips drops of a wanted size",
    place="m g = 2 pi r gamma psi(r/V^(1/3)), solved for r",
)


@physical(returns="length", gravity="acceleration > 0")
def tip_diameter_for_drop(
    density: float,
    surface_tension: float,
    drop_diameter: float,
    gravity: float = 9.80665,
    *,
    factor: Factor = "table",
    outside: Outside = "raise",
) -> float:
    """Diameter of the tip that drips drops of a wanted diameter.

    The inverse of `drop_diameter_tip`, and holds where that does. Small drops need thin tips: the
    tip shrinks with the cube of the drop. Water drops of 2 mm ask for a 0.19 mm tip, where a jet
    or a driven nozzle is the better tool.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    drop_diameter : float or array
        Diameter of the wanted drop [m].
    gravity : float or array
        Acceleration of gravity [m/s2].
    factor : {"table", "quadratic", "polynomial", "power"}, keyword-only
        The published curve of the drop weight factor.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens to drops that the curve knows no tip for.

    Returns
    -------
    float or array
        Diameter of the circle that the drop hangs from [m]: the outer one of a wetted tip.

    Raises
    ------
    OutOfRange
        For a drop larger than any tip of that curve gives, unless `outside` says otherwise.
    BadInput
        For another word for `factor`.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``phi psi(phi) = rho g V^(2/3)/(2 pi gamma)``, solved by Newton in logarithms, to rounding;
    ``d = 2 phi V^(1/3)``.

    References
    ----------
    W. D. Harkins, F. E. Brown, J. Am. Chem. Soc. 41 (1919) 499.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.tip_diameter_for_drop('998.2 kg/m3', '72.74 mN/m', '3 mm'):.0f}")
    698 micrometer
    """
    volume = math.pi / 6.0 * drop_diameter**3
    result: float = tip_of_volume(
        "tip_diameter_for_drop", density, surface_tension, volume, gravity, factor, outside
    )
    return result
