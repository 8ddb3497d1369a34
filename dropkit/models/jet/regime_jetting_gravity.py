"""Where a jet takes over from dripping under gravity: Clanet & Lasheras 1999."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.errors import Unphysical
from dropkit.models.published import Published

__all__ = ["jetting_flow_gravity", "jetting_velocity_gravity", "jetting_weber_gravity"]

WATER_IN_AIR: Final = 0.37

MODEL: Final = Published(
    gives="Weber number, speed and flow at which a tube that points down goes from dripping to jetting",
    holds="thin liquid (the derivation has no viscosity) that wets the tube's face, out of a vertical "
    "tube, downward, into still air; flow rising. With flow falling a jet lives on for a while",
    sources=("ClanetLasheras1999",),
    mark="S2",
    place="We = 4 (Bo_o/Bo) {1 + K Bo_o Bo - [(1 + K Bo_o Bo)^2 - 1]^(1/2)}^2, K = 0.37",
    agreement="the abstract tells of good agreement over a wide range of Bond numbers; no points were "
    "seen",
)


@physical(returns="ratio", gravity="acceleration > 0", constant="ratio > 0")
def jetting_weber_gravity(
    density: float,
    surface_tension: float,
    nozzle_diameter: float,
    outer_diameter: float,
    gravity: float = 9.80665,
    *,
    constant: float = WATER_IN_AIR,
) -> float:
    """Weber number at which a tube that points down goes from dripping to jetting.

    Holds for thin liquids that wet the face of a vertical tube, in air. For a thin wall it tends to
    4 as the tube gets finer, and falls for wide ones.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    nozzle_diameter : float or array
        Inner diameter of the tube [m].
    outer_diameter : float or array
        Outer diameter of the tube; equal to the inner one where the liquid does not wet the
        face, or the rim is sharp [m].
    gravity : float or array
        Acceleration of gravity [m/s2].
    constant : float or array, keyword-only
        K [-], 0.37 for water in air.

    Returns
    -------
    float or array
        ``rho V^2 D/gamma`` with the inner diameter and the mean speed inside [-].

    Raises
    ------
    Unphysical
        Where the outer diameter is smaller than the inner one.
    UnitError
        An argument of another dimension.

    Notes
    -----
    ``We = 4 (Bo_o/Bo) {1 + y - [(1 + y)^2 - 1]^(1/2)}^2``, ``y = K Bo_o Bo`` [S2], with
    ``Bo = [rho g D^2/(2 gamma)]^(1/2)``: a square root, with a 2 under it. It is computed as
    ``4 (D_o/D)/{1 + y + [y (2 + y)]^(1/2)}^2``, which loses no digits for fine tubes.

    References
    ----------
    C. Clanet, J. C. Lasheras, J. Fluid Mech. 383 (1999) 307.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> round(jet.jetting_weber_gravity(998.2, 0.0727, 1.5e-3, 2e-3), 3)
    2.473
    """
    if bool(np.any(outer_diameter < nozzle_diameter)):
        raise Unphysical(
            "an outer diameter is smaller than the inner one",
            allowed="outer_diameter >= nozzle_diameter",
        )
    y: Any = constant * density * gravity * nozzle_diameter * outer_diameter
    y = y / (2.0 * surface_tension)
    root: Any = (y * (2.0 + y)) ** 0.5
    found: float = 4.0 * (outer_diameter / nozzle_diameter) / (1.0 + y + root) ** 2
    return found


@physical(returns="velocity", gravity="acceleration > 0", constant="ratio > 0")
def jetting_velocity_gravity(
    density: float,
    surface_tension: float,
    nozzle_diameter: float,
    outer_diameter: float,
    gravity: float = 9.80665,
    *,
    constant: float = WATER_IN_AIR,
) -> float:
    """Mean speed in a tube that points down, above which it jets rather than drips.

    Holds where `jetting_weber_gravity` does.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    nozzle_diameter : float or array
        Inner diameter of the tube [m].
    outer_diameter : float or array
        Outer diameter of the tube [m].
    gravity : float or array
        Acceleration of gravity [m/s2].
    constant : float or array, keyword-only
        K [-], 0.37 for water in air.

    Returns
    -------
    float or array
        Mean speed inside the tube, not that of the jet [m/s].

    Raises
    ------
    Unphysical
        Where the outer diameter is smaller than the inner one.
    UnitError
        An argument of another dimension.

    Notes
    -----
    ``V = (We gamma/(rho D))^(1/2)``, with We of `jetting_weber_gravity`.

    References
    ----------
    C. Clanet, J. C. Lasheras, J. Fluid Mech. 383 (1999) 307.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.jetting_velocity_gravity('998 kg/m3', '72.7 mN/m', '1.5 mm', '2 mm'):.2f}")
    0.35 meter / second
    """
    weber: Any = jetting_weber_gravity.si(
        density, surface_tension, nozzle_diameter, outer_diameter, gravity, constant=constant
    )
    found: float = (weber * surface_tension / (density * nozzle_diameter)) ** 0.5
    return found


@physical(returns="flow", gravity="acceleration > 0", constant="ratio > 0")
def jetting_flow_gravity(
    density: float,
    surface_tension: float,
    nozzle_diameter: float,
    outer_diameter: float,
    gravity: float = 9.80665,
    *,
    constant: float = WATER_IN_AIR,
) -> float:
    """Flow of a tube that points down, above which it jets rather than drips.

    Holds where `jetting_weber_gravity` does.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    nozzle_diameter : float or array
        Inner diameter of the tube [m].
    outer_diameter : float or array
        Outer diameter of the tube [m].
    gravity : float or array
        Acceleration of gravity [m/s2].
    constant : float or array, keyword-only
        K [-], 0.37 for water in air.

    Returns
    -------
    float or array
        Volume flow [m3/s].

    Raises
    ------
    Unphysical
        Where the outer diameter is smaller than the inner one.
    UnitError
        An argument of another dimension.

    Notes
    -----
    ``Q = pi D^2 V/4``, with V of `jetting_velocity_gravity`.

    References
    ----------
    C. Clanet, J. C. Lasheras, J. Fluid Mech. 383 (1999) 307.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.jetting_flow_gravity('998 kg/m3', '72.7 mN/m', '1.5 mm', '2 mm'):.1f}")
    36.7 milliliter / minute
    """
    speed: Any = jetting_velocity_gravity.si(
        density, surface_tension, nozzle_diameter, outer_diameter, gravity, constant=constant
    )
    found: float = math.pi / 4.0 * nozzle_diameter * nozzle_diameter * speed
    return found
