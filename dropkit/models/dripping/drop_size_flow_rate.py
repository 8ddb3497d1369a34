"""Size of the drop from a nozzle at a flow that is not slow: Scheele & Meister 1968."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.errors import Unphysical
from dropkit.models.dripping._factors import CURVES, buoyant
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["drop_volume_flow", "jetting_velocity_liquid"]

DRIPPING: Final = Range(
    0.0, 1.0, "the speed in the nozzle over that at which the same authors see a jet", ""
)

MODEL: Final = Published(
    gives="size of the drop from a nozzle at a flow that is not slow, and the speed where it jets",
    holds="drops of one thin liquid in another, or in a gas, from a thin-walled nozzle, below jetting",
    sources=("ScheeleMeister1968", "HarkinsBrown1919", "StandardDropper"),
    mark="M+",
    place="V = psi [pi gamma d/(drho g) + 20 mu_o Q d/(D^2 drho g) - 4 rho Q U/(3 drho g) "
    "+ 4.5 (Q^2 d^2 rho gamma/(drho g)^2)^(1/3)]; U = 1.73 [gamma/(rho d) (1 - d/D)]^(1/2)",
    ranges=(DRIPPING,),
    agreement="standard dropper at a drop per second, in air: water +12 %, ethanol +7 %, ether +5 %, "
    "where the slow table is at -5, -9 and -11 %; liquids in liquids: no points were seen",
)

# Constants of the paper [M], checked by dimension and by the standard dropper.
_DRAG, _THRUST, _NECK, _JET = 20.0, 4.0 / 3.0, 4.5, math.sqrt(3.0)
_ROUNDS: Final = 60


@physical(returns="volume", gravity="acceleration > 0")
def drop_volume_flow(
    density: float,
    interfacial_tension: float,
    flow: float,
    tip_diameter: float,
    outer_density: float,
    outer_viscosity: float,
    gravity: float = 9.80665,
    *,
    outside: Outside = "raise",
) -> float:
    """Volume of the drop from a nozzle at a flow that is not slow.

    Holds for drops of a thin liquid in another liquid, or in a gas, from a thin-walled nozzle,
    below the speed at which a jet forms. Close to that speed drops come in two or more sizes, and
    no single one is right. Without flow it is the slow drop of Harkins & Brown.

    Parameters
    ----------
    density : float or array
        Density of the drop's liquid [kg/m3].
    interfacial_tension : float or array
        Tension of the interface; the surface tension in a gas [N/m].
    flow : float or array
        Volume flow of the nozzle [m3/s].
    tip_diameter : float or array
        Diameter of the nozzle, where the drop hangs from [m].
    outer_density : float or array
        Density of the fluid around the drop [kg/m3].
    outer_viscosity : float or array
        Dynamic viscosity of the fluid around the drop [Pa*s].
    gravity : float or array
        Acceleration of gravity [m/s2].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above the speed at which a jet forms.

    Returns
    -------
    float or array
        The volume [m3].

    Raises
    ------
    OutOfRange
        Where a jet forms, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, outside its domain, or equal densities.

    Notes
    -----
    ``V = psi [pi gamma d/(drho g) + 20 mu_o Q d/(D^2 drho g) - 4 rho Q U/(3 drho g)
    + 4.5 (Q^2 d^2 rho gamma/(drho g)^2)^(1/3)]`` [M+]: the ideal drop, the drag on it, the thrust of
    the flow, and what flows in while the neck closes; psi by the table of Harkins & Brown, at
    ``r/V^(1/3)``; solved by Newton in logarithms. The constants are remembered. For the standard
    dropper at one drop per second in air it is 5 to 12 % too heavy, where the slow table is 5 to
    11 % too light: the truth lies between the two.

    References
    ----------
    G. F. Scheele, B. J. Meister, AIChE J. 14 (1968) 9.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> oil = ("860 kg/m3", "36 mN/m")
    >>> water = ("998 kg/m3", "1 mPa*s")
    >>> for flow in ("0.1 mL/min", "3 mL/min"):
    ...     print(f"{dripping.drop_volume_flow(*oil, flow, '2 mm', *water).to('uL'):.0f}")
    140 microliter
    159 microliter
    """
    weight = buoyant(density, outer_density) * gravity
    radius = 0.5 * tip_diameter
    speed = flow / (math.pi * radius * radius)
    ideal: Any = math.pi * tip_diameter * interfacial_tension / weight
    drag = _DRAG * outer_viscosity * flow * tip_diameter / weight
    thrust = _THRUST * density * flow * speed / weight
    neck = _NECK * ((flow * tip_diameter / weight) ** 2 * density * interfacial_tension) ** (
        1.0 / 3.0
    )
    with np.errstate(all="ignore"):
        log_volume = np.log(np.asarray(ideal + neck, dtype=np.float64))
        for _ in range(_ROUNDS):
            volume: Any = np.exp(log_volume)
            diameter = (6.0 / math.pi * volume) ** (1.0 / 3.0)
            held = drag / diameter**2
            bracket = ideal + held - thrust + neck
            ratio = radius / volume ** (1.0 / 3.0)
            psi, slope = CURVES["table"].psi(ratio)
            # Newton in logarithms: ln V = ln psi + ln bracket, a near-straight line there.
            rise = 1.0 + ratio * slope / (3.0 * psi) + 2.0 / 3.0 * held / bracket
            step = (np.log(psi) + np.log(bracket) - log_volume) / rise
            log_volume = log_volume + step
            if not np.any(np.abs(step) > 1e-13):
                break
        volume = np.where(np.abs(step) < 1e-10, np.exp(log_volume), np.nan)
        diameter = (6.0 / math.pi * volume) ** (1.0 / 3.0)
        # Where the thrust leaves no drop at all, the speed is past every limit.
        diameter = np.where(np.isnan(volume), np.inf, diameter)
        limit = _jetting(density, interfacial_tension, tip_diameter, diameter)
        reached: Any = np.asarray(speed / limit)
    if volume.ndim == 0:
        volume, reached = float(volume), float(reached)
    mask = outside_mask("drop_volume_flow", outside, (reached, DRIPPING))
    result: float = blank_outside(volume, mask)
    return result


@physical(returns="velocity")
def jetting_velocity_liquid(
    density: float, interfacial_tension: float, tip_diameter: float, drop_diameter: float
) -> float:
    """Speed in a nozzle above which a liquid jets into another one rather than drips.

    Holds for thin liquids from a thin-walled nozzle. In air, downward, `jet` has the criterion of
    Clanet & Lasheras, which knows gravity and was measured.

    Parameters
    ----------
    density : float or array
        Density of the drop's liquid [kg/m3].
    interfacial_tension : float or array
        Tension of the interface [N/m].
    tip_diameter : float or array
        Diameter of the nozzle [m].
    drop_diameter : float or array
        Diameter of the drop that drips below that speed, such as `drop_volume_flow` gives [m].

    Returns
    -------
    float or array
        Mean speed in the nozzle [m/s].

    Raises
    ------
    Unphysical
        Where the drop is not wider than the nozzle.
    UnitError
        An argument of another dimension.

    Notes
    -----
    ``rho U^2 d/gamma = 3 (1 - d/D)`` [M]: remembered; below the 4 to which the criterion of Clanet &
    Lasheras tends for thin tips.

    References
    ----------
    G. F. Scheele, B. J. Meister, AIChE J. 14 (1968) 15.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> found = dripping.jetting_velocity_liquid("860 kg/m3", "36 mN/m", "2 mm", "6 mm")
    >>> print(f"{found:.3f}")
    0.205 meter / second
    """
    if bool(np.any(drop_diameter <= tip_diameter)):
        raise Unphysical(
            "a drop is not wider than its nozzle", allowed="drop_diameter > tip_diameter"
        )
    result: float = _jetting(density, interfacial_tension, tip_diameter, drop_diameter)
    return result


def _jetting(density: Any, tension: Any, tip_diameter: Any, drop_diameter: Any) -> Any:
    room = 1.0 - tip_diameter / drop_diameter
    return _JET * (tension / (density * tip_diameter) * room) ** 0.5
