"""Pressure and flow of a long smooth tube in turbulent flow: Blasius' friction."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.nozzle._losses import NozzlePressure
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["flow_turbulent_tube", "pressure_turbulent_tube"]

TURBULENT: Final = Range(4000.0, 1e5, "the Reynolds number of the tube", "")
LONG: Final = Range(10.0 * (1.0 - losses.ROUNDING), math.inf, "the length over the diameter", "")

# Kinetic energy factor of a 1/7-power profile [C].
PROFILE: Final = (8.0 / 7.0) ** 3 * (15.0 / 7.0) ** 3 / (4.0 * (10.0 / 7.0) * (17.0 / 7.0))

MODEL: Final = Published(
    gives="pressure of a long smooth tube in turbulent flow, and back",
    holds="Newtonian liquid, smooth tube of ten diameters or more, jet into gas",
    sources=("Blasius1913", "Idelchik", "MechanicalEngineersHandbook"),
    mark="M+",
    place="friction factor 0.3164 Re^-0.25 from memory; check: Colebrook's smooth-pipe form, seen "
    "in a handbook, within 3.4 % from 4000 to 100000",
    ranges=(TURBULENT, LONG, losses.DRIVING),
    agreement="no measured points were seen; friction within 3.4 % of Colebrook's explicit form for "
    "smooth pipes. The first 20 to 30 diameters, where the flow develops, take more",
)


@physical(
    returns=losses.PARTS,
    contraction="ratio > 0",
    entry_loss="ratio >= 0",
)
def pressure_turbulent_tube(
    density: float,
    viscosity: float,
    surface_tension: float,
    flow: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = 1.0,
    entry_loss: float = 0.5,
    outside: Outside = "raise",
) -> NozzlePressure:
    """Gauge pressure that drives a turbulent flow through a long smooth tube, in its parts.

    Holds for Newtonian liquids, Reynolds numbers of 4000 to 1e5 and tubes of ten diameters or
    more. Between 2100 and 4000 the flow may be either, and no model of this folder speaks.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    flow : float or array
        Volume flow through the tube [m3/s].
    nozzle_diameter : float or array
        Inner diameter of the tube [m].
    nozzle_length : float or array
        Length of the tube [m].
    contraction : float or array, keyword-only
        Diameter of the jet over that of the tube, for the capillary pressure [-].
    entry_loss : float or array, keyword-only
        What is lost at the entry, in units of ``rho U^2/2``: 0.5 for a sharp edge, less for a
        rounded one [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside those ranges.

    Returns
    -------
    NozzlePressure
        ``total``, ``kinetic``, ``entry``, ``viscous`` and ``capillary`` [Pa].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``kinetic = 1.058 rho U^2/2`` (1/7-power profile) [C], ``entry = k rho U^2/2`` with Idelchik's
    k = 0.5 for a sharp edge [S2], ``viscous = 0.3164 Re^-0.25 (L/d) rho U^2/2`` (Blasius) [M+],
    ``capillary = 2 gamma/d_jet``; U is the mean speed in the tube.

    References
    ----------
    H. Blasius, Forschungsheft VDI 131 (1913), from memory.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> parts = nozzle.pressure_turbulent_tube(*water, "0.6 L/min", "1 mm", "30 mm")
    >>> print(f"{parts.total:.0f}, friction {parts.viscous:.0f}")
    199 kilopascal, friction 72 kilopascal
    """
    d: Any = nozzle_diameter
    velocity = losses.mean_velocity(flow, d)
    reynolds = density * velocity * d / viscosity
    mask = outside_mask(
        "pressure_turbulent_tube", outside, (reynolds, TURBULENT), (nozzle_length / d, LONG)
    )
    head = 0.5 * density * velocity * velocity
    viscous = 0.3164 * reynolds**-0.25 * nozzle_length / d * head
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    return losses.nozzle_pressure(
        PROFILE * head, entry_loss * head, viscous, capillary, mask, blank_outside
    )


@physical(
    returns="flow",
    gauge_pressure="gauge_pressure > 0",
    contraction="ratio > 0",
    entry_loss="ratio >= 0",
)
def flow_turbulent_tube(
    density: float,
    viscosity: float,
    surface_tension: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = 1.0,
    entry_loss: float = 0.5,
    outside: Outside = "raise",
) -> float:
    """Turbulent flow through a long smooth tube: inverse of `pressure_turbulent_tube`.

    Holds for Newtonian liquids, Reynolds numbers of 4000 to 1e5 and tubes of ten diameters or
    more.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    gauge_pressure : float or array
        Pressure ahead of the nozzle, above that of the surroundings [Pa].
    nozzle_diameter : float or array
        Inner diameter of the tube [m].
    nozzle_length : float or array
        Length of the tube [m].
    contraction : float or array, keyword-only
        Diameter of the jet over that of the tube, for the capillary pressure [-].
    entry_loss : float or array, keyword-only
        What is lost at the entry, in units of ``rho U^2/2`` [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside those ranges, or where surface tension holds the liquid back: there
        is no flow then, NaN.

    Returns
    -------
    float or array
        Volume flow [m3/s].

    Raises
    ------
    OutOfRange
        Outside those ranges, or for a pressure below the capillary one, unless `outside` says
        otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    Newton's method on the logarithm of the Reynolds number, kept inside a bracket; pressure rises
    with flow, so there is one root.

    References
    ----------
    H. Blasius, Forschungsheft VDI 131 (1913), from memory.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> print(f"{nozzle.flow_turbulent_tube(*water, '198.6 kPa', '1 mm', '30 mm').to('L/min'):.2f}")
    0.60 liter / minute
    """
    d: Any = nozzle_diameter
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    pushed = outside_mask(
        "flow_turbulent_tube",
        outside,
        (gauge_pressure / capillary, losses.DRIVING),
        (nozzle_length / d, LONG),
    )
    drive = losses.driving_pressure(gauge_pressure, capillary)
    target = losses.logarithm(2.0 * drive * density * d * d / (viscosity * viscosity))

    def excess(y: Any) -> tuple[Any, Any]:
        friction = 0.3164 * losses.exponential(-0.25 * y) * nozzle_length / d
        loss = PROFILE + entry_loss + friction
        return 2.0 * y + losses.logarithm(loss) - target, 2.0 - 0.25 * friction / loss

    reynolds = losses.exponential(losses.increasing_root(excess, 0.5 * target))
    mask = outside_mask("flow_turbulent_tube", outside, (reynolds, TURBULENT))
    velocity = reynolds * viscosity / (density * d)
    result: float = blank_outside(losses.volume_flow(velocity, d), pushed | mask)
    return result
