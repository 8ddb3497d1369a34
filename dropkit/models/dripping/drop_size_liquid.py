"""Drops of one liquid in another: the drop weight with buoyancy and interfacial tension."""

from __future__ import annotations

import math
from typing import Final

from dropkit.boundary import physical
from dropkit.models.dripping._factors import (
    Factor,
    buoyant,
    statement,
    tension_of_volume,
    tip_of_volume,
    volume_of_tip,
)
from dropkit.models.published import Published
from dropkit.validity import Outside

__all__ = [
    "drop_diameter_liquid",
    "drop_volume_liquid",
    "interfacial_tension_drop_volume",
    "tip_diameter_for_drop_liquid",
]

MODEL: Final[Published] = statement(
    "size of the drop that leaves a tip slowly inside another liquid",
    place="V |rho - rho_o| g = 2 pi r gamma psi(r/V^(1/3))",
)


@physical(returns="volume", gravity="acceleration > 0")
def drop_volume_liquid(
    density: float,
    interfacial_tension: float,
    tip_diameter: float,
    outer_density: float,
    gravity: float = 9.80665,
    *,
    factor: Factor = "table",
    outside: Outside = "raise",
) -> float:
    """Volume of the drop that leaves a tip slowly inside another liquid, sinking or rising.

    Holds for drops that form slowly in a liquid at rest, neither of them viscous. A heavier drop
    sinks from a tip that points down, a lighter one rises from a tip that points up. The circle
    is the outer edge where the drop's liquid wets the tip, the bore where the other one does.

    Parameters
    ----------
    density : float or array
        Density of the drop's liquid [kg/m3].
    interfacial_tension : float or array
        Tension of the interface, both liquids saturated with each other [N/m].
    tip_diameter : float or array
        Diameter of the circle that the drop hangs from [m].
    outer_density : float or array
        Density of the liquid around it [kg/m3].
    gravity : float or array
        Acceleration of gravity [m/s2].
    factor : {"table", "quadratic", "polynomial", "power"}, keyword-only
        The published curve of the drop weight factor.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside the range of that curve.

    Returns
    -------
    float or array
        The volume [m3].

    Raises
    ------
    OutOfRange
        For a tip too wide (or, by some curves, too narrow), unless `outside` says otherwise.
    BadInput
        For another word for `factor`.
    UnitError, Unphysical
        An argument of another dimension, outside its domain, or equal densities.

    See Also
    --------
    drop_volume_flow : The same at a flow that is not slow.

    Notes
    -----
    ``V |rho - rho_o| g = 2 pi r gamma psi(phi)``: the drop weight in air with the difference of
    densities in place of the density. Heertjes et al. fitted their curve for liquids in liquids.

    References
    ----------
    W. D. Harkins, F. E. Brown, J. Am. Chem. Soc. 41 (1919) 499.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> found = dripping.drop_volume_liquid("860 kg/m3", "36 mN/m", "2 mm", "998 kg/m3")
    >>> print(f"{found.to('uL'):.0f}")
    138 microliter
    """
    weight = buoyant(density, outer_density)
    result: float = volume_of_tip(
        "drop_volume_liquid", weight, interfacial_tension, tip_diameter, gravity, factor, outside
    )
    return result


@physical(returns="length", gravity="acceleration > 0")
def drop_diameter_liquid(
    density: float,
    interfacial_tension: float,
    tip_diameter: float,
    outer_density: float,
    gravity: float = 9.80665,
    *,
    factor: Factor = "table",
    outside: Outside = "raise",
) -> float:
    """Diameter of the drop that leaves a tip slowly inside another liquid.

    Holds where `drop_volume_liquid` does.

    Parameters
    ----------
    density : float or array
        Density of the drop's liquid [kg/m3].
    interfacial_tension : float or array
        Tension of the interface [N/m].
    tip_diameter : float or array
        Diameter of the circle that the drop hangs from [m].
    outer_density : float or array
        Density of the liquid around it [kg/m3].
    gravity : float or array
        Acceleration of gravity [m/s2].
    factor : {"table", "quadratic", "polynomial", "power"}, keyword-only
        The published curve of the drop weight factor.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside the range of that curve.

    Returns
    -------
    float or array
        Diameter of the sphere of the drop's volume [m].

    Raises
    ------
    OutOfRange
        For a tip too wide (or, by some curves, too narrow), unless `outside` says otherwise.
    BadInput
        For another word for `factor`.
    UnitError, Unphysical
        An argument of another dimension, outside its domain, or equal densities.

    Notes
    -----
    ``D = (6 V/pi)^(1/3)``, with V of `drop_volume_liquid`.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> found = dripping.drop_diameter_liquid("860 kg/m3", "36 mN/m", "2 mm", "998 kg/m3")
    >>> print(f"{found.to('mm'):.2f}")
    6.40 millimeter
    """
    weight = buoyant(density, outer_density)
    volume = volume_of_tip(
        "drop_diameter_liquid", weight, interfacial_tension, tip_diameter, gravity, factor, outside
    )
    result: float = (6.0 / math.pi * volume) ** (1.0 / 3.0)
    return result


@physical(returns="length", gravity="acceleration > 0")
def tip_diameter_for_drop_liquid(
    density: float,
    interfacial_tension: float,
    drop_diameter: float,
    outer_density: float,
    gravity: float = 9.80665,
    *,
    factor: Factor = "table",
    outside: Outside = "raise",
) -> float:
    """Diameter of the tip that gives drops of a wanted diameter inside another liquid.

    The inverse of `drop_diameter_liquid`, and holds where that does.

    Parameters
    ----------
    density : float or array
        Density of the drop's liquid [kg/m3].
    interfacial_tension : float or array
        Tension of the interface [N/m].
    drop_diameter : float or array
        Diameter of the wanted drop [m].
    outer_density : float or array
        Density of the liquid around it [kg/m3].
    gravity : float or array
        Acceleration of gravity [m/s2].
    factor : {"table", "quadratic", "polynomial", "power"}, keyword-only
        The published curve of the drop weight factor.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens to drops that the curve knows no tip for.

    Returns
    -------
    float or array
        Diameter of the circle that the drop hangs from [m].

    Raises
    ------
    OutOfRange
        For a drop larger than any tip of that curve gives, unless `outside` says otherwise.
    BadInput
        For another word for `factor`.
    UnitError, Unphysical
        An argument of another dimension, outside its domain, or equal densities.

    Notes
    -----
    ``phi psi(phi) = |rho - rho_o| g V^(2/3)/(2 pi gamma)``; ``d = 2 phi V^(1/3)``.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> found = dripping.tip_diameter_for_drop_liquid("860 kg/m3", "36 mN/m", "5 mm", "998 kg/m3")
    >>> print(f"{found:.0f}")
    869 micrometer
    """
    weight = buoyant(density, outer_density)
    volume = math.pi / 6.0 * drop_diameter**3
    result: float = tip_of_volume(
        "tip_diameter_for_drop_liquid",
        weight,
        interfacial_tension,
        volume,
        gravity,
        factor,
        outside,
    )
    return result


@physical(returns="surface_tension", gravity="acceleration > 0")
def interfacial_tension_drop_volume(
    density: float,
    volume: float,
    tip_diameter: float,
    outer_density: float,
    gravity: float = 9.80665,
    *,
    factor: Factor = "table",
    outside: Outside = "raise",
) -> float:
    """Interfacial tension from the volume of a drop that left a known tip slowly.

    Holds where `drop_volume_liquid` does. Surfactants need time: a young drop shows a higher
    tension than an old one.

    Parameters
    ----------
    density : float or array
        Density of the drop's liquid [kg/m3].
    volume : float or array
        Volume of one drop [m3].
    tip_diameter : float or array
        Diameter of the circle that the drop hung from [m].
    outer_density : float or array
        Density of the liquid around it [kg/m3].
    gravity : float or array
        Acceleration of gravity [m/s2].
    factor : {"table", "quadratic", "polynomial", "power"}, keyword-only
        The published curve of the drop weight factor.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside the range of that curve.

    Returns
    -------
    float or array
        Tension of the interface [N/m].

    Raises
    ------
    OutOfRange
        For a tip too wide for such a drop, unless `outside` says otherwise.
    BadInput
        For another word for `factor`.
    UnitError, Unphysical
        An argument of another dimension, outside its domain, or equal densities.

    Notes
    -----
    ``gamma = V |rho - rho_o| g F/r``, ``F = 1/(2 pi psi)``.

    References
    ----------
    P. M. Heertjes et al., Chem. Eng. Sci. 26 (1971).

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> tension = dripping.interfacial_tension_drop_volume
    >>> print(f"{tension('860 kg/m3', '115 uL', '2 mm', '998 kg/m3'):.1f}")
    30.5 millinewton / meter
    """
    weight = buoyant(density, outer_density)
    result: float = tension_of_volume(
        "interfacial_tension_drop_volume", weight, volume, tip_diameter, gravity, factor, outside
    )
    return result
