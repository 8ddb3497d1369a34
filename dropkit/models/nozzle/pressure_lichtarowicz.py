"""Discharge coefficient, pressure and flow of holes 1.5 to 10 diameters long: Lichtarowicz."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.nozzle._losses import NozzlePressure
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["discharge_coefficient_long_orifice", "flow_long_orifice", "pressure_long_orifice"]

HEAD: Final = Range(10.0, 2e4, "the Reynolds number on the loss-free speed", "")
LENGTH: Final = Range(
    1.5 * (1.0 - losses.ROUNDING),
    10.0 * (1.0 + losses.ROUNDING),
    "the length over the diameter",
    "",
)
_PER_DECADE: Final = 1.0 / math.log(10.0)

MODEL: Final = Published(
    gives="discharge coefficient of a sharp-edged hole 1.5 to 10 diameters long, its pressure, "
    "its flow",
    holds="liquid that does not cavitate, sharp entry from a wide chamber",
    sources=("Lichtarowicz1965", "AnsysFluentTheory"),
    mark="S2",
    place="eqs. 7 and 12 as extracted from the paper by a reader; the Reynolds number is the one "
    "on the loss-free speed, as a manual and a published code take it",
    ranges=(HEAD, LENGTH, losses.DRIVING),
    agreement="as extracted, the authors' own points within 0.02 from 10 to 20000, the limit at "
    "high Reynolds number within 1.5 %; 0.82 measured for short mouthpieces (1911) against 0.81. "
    "No points were seen",
)


def _inverse(head: Any, ratio: Any) -> tuple[Any, Any, Any]:
    """1/Cd, its derivative by the logarithm of the head's Reynolds number, and 1/Cd at its end."""
    # 0.827 - 0.0085 L/d from 2 on, 0.810 below: the two meet at 2.
    held = np.maximum(ratio, 2.0) if isinstance(ratio, np.ndarray) else max(ratio, 2.0)
    held = held + 0.0 * ratio
    ultimate = 1.0 / (0.827 - 0.0085 * held)
    viscous = 20.0 * (1.0 + 2.25 * ratio) / head
    decades = losses.logarithm(0.00015 * head) * _PER_DECADE
    spread = 1.0 + 7.5 * decades * decades
    bump = 0.005 * ratio / spread
    slope = -viscous + 15.0 * _PER_DECADE * decades * bump / spread
    return ultimate + viscous - bump, slope, ultimate


@physical(returns="ratio", pressure_drop="pressure > 0")
def discharge_coefficient_long_orifice(
    density: float,
    viscosity: float,
    pressure_drop: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Discharge coefficient of a sharp-edged hole of 1.5 to 10 diameters: the default for plates.

    Holds for liquids that do not cavitate and Reynolds numbers of 10 to 2e4 on the loss-free
    speed. Shorter holes can switch between two flows; the authors advise against them.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    pressure_drop : float or array
        Pressure across the hole, without the capillary pressure of the jet [Pa].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    nozzle_length : float or array
        Length of the hole, the thickness of the plate [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside those ranges.

    Returns
    -------
    float or array
        Flow over that of a loss-free jet as wide as the hole [-].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``1/Cd = 1/Cu + 20 (1 + 2.25 L/d)/Re - 0.005 (L/d)/(1 + 7.5 (log10(0.00015 Re))^2)``,
    ``Cu = 0.827 - 0.0085 L/d`` from 2 diameters on, 0.810 below [S2], with ``Re = d
    sqrt(2 rho dp)/mu``. The Reynolds number is that of the HEAD: with the one on the mean speed,
    as some copies have it, a hole of ten diameters at 10 would need 35 times the pressure of
    Poiseuille's law. A copy with 0.0015 for 0.005 was met too.

    References
    ----------
    A. Lichtarowicz, R. K. Duggins, E. Markland, J. Mech. Eng. Sci. 7 (1965) 210-219.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> cd = nozzle.discharge_coefficient_long_orifice(
    ...     "998 kg/m3", "1 mPa*s", "2 bar", "0.1 mm", "0.4 mm"
    ... )
    >>> print(f"{cd:.3f}")
    0.738
    """
    head: Any = nozzle_diameter * (2.0 * density * pressure_drop) ** 0.5 / viscosity
    ratio: Any = nozzle_length / nozzle_diameter
    mask = outside_mask(
        "discharge_coefficient_long_orifice", outside, (head, HEAD), (ratio, LENGTH)
    )
    result: float = blank_outside(1.0 / _inverse(head, ratio)[0], mask)
    return result


@physical(returns=losses.PARTS, contraction="ratio > 0")
def pressure_long_orifice(
    density: float,
    viscosity: float,
    surface_tension: float,
    flow: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = 1.0,
    outside: Outside = "raise",
) -> NozzlePressure:
    """Gauge pressure that drives a flow through a hole of 1.5 to 10 diameters, in its parts.

    Holds as `discharge_coefficient_long_orifice` does.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    flow : float or array
        Volume flow through the hole [m3/s].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    nozzle_length : float or array
        Length of the hole, the thickness of the plate [m].
    contraction : float or array, keyword-only
        Diameter of the jet over that of the hole, for the capillary pressure [-].
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
    ``dp = rho U^2/(2 Cd^2)``. Of it ``rho U^2/2`` is ``kinetic``, what is lost at high Reynolds
    number ``entry``, the rest ``viscous``; ``capillary = 2 gamma/d_jet``.

    References
    ----------
    A. Lichtarowicz, R. K. Duggins, E. Markland, J. Mech. Eng. Sci. 7 (1965) 210-219.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> print(f"{nozzle.pressure_long_orifice(*water, '6 mL/min', '0.1 mm', '0.4 mm').total:.0f}")
    153 kilopascal
    """
    d: Any = nozzle_diameter
    velocity = losses.mean_velocity(flow, d)
    ratio: Any = nozzle_length / d
    target = losses.logarithm(density * velocity * d / viscosity)

    def excess(y: Any) -> tuple[Any, Any]:
        inverse, slope, _ = _inverse(losses.exponential(y), ratio)
        return y - losses.logarithm(inverse) - target, 1.0 - slope / inverse

    head = losses.exponential(losses.increasing_root(excess, target))
    mask = outside_mask("pressure_long_orifice", outside, (head, HEAD), (ratio, LENGTH))
    inverse, _, ultimate = _inverse(head, ratio)
    kinetic = 0.5 * density * velocity * velocity
    entry = kinetic * (ultimate * ultimate - 1.0)
    viscous = kinetic * (inverse * inverse - ultimate * ultimate)
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    return losses.nozzle_pressure(kinetic, entry, viscous, capillary, mask, blank_outside)


@physical(
    returns="flow",
    gauge_pressure="gauge_pressure > 0",
    contraction="ratio > 0",
)
def flow_long_orifice(
    density: float,
    viscosity: float,
    surface_tension: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = 1.0,
    outside: Outside = "raise",
) -> float:
    """Flow through a hole of 1.5 to 10 diameters: inverse of `pressure_long_orifice`.

    Holds as `discharge_coefficient_long_orifice` does.

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
        Diameter of the hole [m].
    nozzle_length : float or array
        Length of the hole, the thickness of the plate [m].
    contraction : float or array, keyword-only
        Diameter of the jet over that of the hole, for the capillary pressure [-].
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
    ``Q = Cd A sqrt(2 (p - 2 gamma/d_jet)/rho)``, closed, because the coefficient follows from the
    pressure.

    References
    ----------
    A. Lichtarowicz, R. K. Duggins, E. Markland, J. Mech. Eng. Sci. 7 (1965) 210-219.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> print(f"{nozzle.flow_long_orifice(*water, '153.4 kPa', '0.1 mm', '0.4 mm'):.2f}")
    6.00 milliliter / minute
    """
    d: Any = nozzle_diameter
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    ratio: Any = nozzle_length / d
    pushed = outside_mask(
        "flow_long_orifice", outside, (gauge_pressure / capillary, losses.DRIVING)
    )
    drive = losses.driving_pressure(gauge_pressure, capillary)
    head: Any = d * (2.0 * density * drive) ** 0.5 / viscosity
    mask = outside_mask("flow_long_orifice", outside, (head, HEAD), (ratio, LENGTH))
    velocity = (2.0 * drive / density) ** 0.5 / _inverse(head, ratio)[0]
    result: float = blank_outside(losses.volume_flow(velocity, d), pushed | mask)
    return result
