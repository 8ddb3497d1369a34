"""Size of the drop that falls from a tip: the drop weight, solved for the volume."""

from __future__ import annotations

from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.boundary import physical
from dropkit.models.dripping._factors import CURVES, Factor, statement, volume_of_tip
from dropkit.models.published import Published
from dropkit.validity import Outside

__all__ = [
    "DropVolume",
    "drop_diameter_tip",
    "drop_mass_tip",
    "drop_volume_spread",
    "drop_volume_tip",
]

MODEL: Final[Published] = statement(
    "size of the drop that falls slowly from a tip",
    place="m g = 2 pi r gamma psi(r/V^(1/3)), solved for V",
)


class DropVolume(NamedTuple):
    """A drop volume with what the published curves make of it.

    Parameters
    ----------
    volume : float, array or Quantity
        By the table of Harkins & Brown [m3].
    low, high : float, array or Quantity
        The smallest and largest by any curve whose range holds here [m3].

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> found = dripping.drop_volume_spread(998.2, 0.0727, 1e-3)
    >>> found.low < found.volume <= found.high
    True
    """

    volume: Any
    low: Any
    high: Any


@physical(returns="volume", gravity="acceleration > 0")
def drop_volume_tip(
    density: float,
    surface_tension: float,
    tip_diameter: float,
    gravity: float = 9.80665,
    *,
    factor: Factor = "table",
    outside: Outside = "raise",
) -> float:
    """Volume of the drop that falls slowly from a tip.

    Holds for drops that take a minute each, for 1 %; at one per second they are 5 to 12 % larger.
    Clean, level, circular tip; thin liquid; the satellite is counted in. Under a tip ratio of
    0.30 (a 1.9 mm tip for water) Harkins & Brown measured nothing: count on 5 %.

    Parameters
    ----------
    density : float or array
        Density of the liquid, less that of the air where 0.1 % matters [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    tip_diameter : float or array
        Diameter of the circle that the drop hangs from [m]; see `wetted_tip_diameter`.
    gravity : float or array
        Acceleration of gravity [m/s2].
    factor : {"table", "quadratic", "polynomial", "power"}, keyword-only
        The published curve of the drop weight factor: Harkins & Brown by default, Heertjes et
        al., Lee et al., or Yildirim et al.
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
        An argument of another dimension, or outside its domain.

    See Also
    --------
    drop_volume_spread : The same with the spread of the published curves.

    Notes
    -----
    ``V rho g = 2 pi r gamma psi(phi)``, ``phi = r/V^(1/3)``, is solved as
    ``phi^3 psi(phi) = rho g r^2/(2 pi gamma)``, whose left side rises with phi: by Newton in
    logarithms, to rounding.

    References
    ----------
    W. D. Harkins, F. E. Brown, J. Am. Chem. Soc. 41 (1919) 499.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.drop_volume_tip(998.207, '72.74 mN/m', '3 mm').to('uL'):.2f}")
    47.50 microliter
    """
    result: float = volume_of_tip(
        "drop_volume_tip", density, surface_tension, tip_diameter, gravity, factor, outside
    )
    return result


@physical(returns="mass", gravity="acceleration > 0")
def drop_mass_tip(
    density: float,
    surface_tension: float,
    tip_diameter: float,
    gravity: float = 9.80665,
    *,
    factor: Factor = "table",
    outside: Outside = "raise",
) -> float:
    """Mass of the drop that falls slowly from a tip.

    Holds where `drop_volume_tip` does.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    tip_diameter : float or array
        Diameter of the circle that the drop hangs from [m].
    gravity : float or array
        Acceleration of gravity [m/s2].
    factor : {"table", "quadratic", "polynomial", "power"}, keyword-only
        The published curve of the drop weight factor.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside the range of that curve.

    Returns
    -------
    float or array
        The mass [kg].

    Raises
    ------
    OutOfRange
        For a tip too wide (or, by some curves, too narrow), unless `outside` says otherwise.
    BadInput
        For another word for `factor`.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``m = rho V``, with V of `drop_volume_tip`.

    References
    ----------
    W. D. Harkins, F. E. Brown, J. Am. Chem. Soc. 41 (1919) 499.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.drop_mass_tip(998.207, '72.74 mN/m', '3 mm').to('mg'):.2f}")
    47.42 milligram
    """
    result: float = density * volume_of_tip(
        "drop_mass_tip", density, surface_tension, tip_diameter, gravity, factor, outside
    )
    return result


@physical(returns="length", gravity="acceleration > 0")
def drop_diameter_tip(
    density: float,
    surface_tension: float,
    tip_diameter: float,
    gravity: float = 9.80665,
    *,
    factor: Factor = "table",
    outside: Outside = "raise",
) -> float:
    """Diameter of the drop that falls slowly from a tip.

    Holds where `drop_volume_tip` does.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    tip_diameter : float or array
        Diameter of the circle that the drop hangs from [m].
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
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``D = (6 V/pi)^(1/3)``, with V of `drop_volume_tip`.

    References
    ----------
    W. D. Harkins, F. E. Brown, J. Am. Chem. Soc. 41 (1919) 499.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> print(f"{dripping.drop_diameter_tip(998.207, '72.74 mN/m', '3 mm').to('mm'):.3f}")
    4.493 millimeter
    """
    volume = volume_of_tip(
        "drop_diameter_tip", density, surface_tension, tip_diameter, gravity, factor, outside
    )
    result: float = (6.0 / np.pi * volume) ** (1.0 / 3.0)
    return result


@physical(returns=("volume", "volume", "volume"), gravity="acceleration > 0")
def drop_volume_spread(
    density: float,
    surface_tension: float,
    tip_diameter: float,
    gravity: float = 9.80665,
    *,
    outside: Outside = "raise",
) -> DropVolume:
    """Volume of the drop from a tip, with the spread of the published curves.

    Holds where `drop_volume_tip` does. The spread is what authors disagree by for slow drops of
    thin liquids, not the error of fast dripping, dirt or a tip that is half wetted.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    tip_diameter : float or array
        Diameter of the circle that the drop hangs from [m].
    gravity : float or array
        Acceleration of gravity [m/s2].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside the range of the table.

    Returns
    -------
    DropVolume
        ``volume`` by the table, ``low`` and ``high`` by any of the four curves [m3].

    Raises
    ------
    OutOfRange
        For a tip too wide, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    Each curve counts where its own range holds. From a tip ratio of 0.4 their factors lie within
    1.4 % of each other, from 0.3 within 2.1 %, and below that up to 5 % apart: the power law is
    lowest there. Eschbaum's two tips under 0.30 lie within 3 % of the table's line.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> found = dripping.drop_volume_spread("998.2 kg/m3", "72.74 mN/m", "0.82 mm")
    >>> print(*(f"{each.to('uL'):.1f~}" for each in found))
    16.3 µl 15.5 µl 16.3 µl
    """
    name = "drop_volume_spread"
    args = (density, surface_tension, tip_diameter, gravity)
    volume: Any = volume_of_tip(name, *args, "table", outside)
    low = high = volume
    for word in CURVES:
        other = volume_of_tip(name, *args, word, "nan")
        low, high = np.fmin(low, other), np.fmax(high, other)
    # Where the table gives nothing, a curve that reaches further gives no spread either.
    low, high = low + 0.0 * volume, high + 0.0 * volume
    if not isinstance(volume, np.ndarray):
        low, high = float(low), float(high)
    return DropVolume(volume, low, high)
