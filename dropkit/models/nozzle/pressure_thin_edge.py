"""Discharge coefficient, pressure and flow of a sharp-edged hole in a thin plate."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.nozzle._losses import NozzlePressure
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["discharge_coefficient_thin_plate", "flow_thin_plate", "pressure_thin_plate"]

THIN: Final = Range(0.0, 0.5 * (1.0 + losses.ROUNDING), "the length over the diameter", "")
# Free streamlines give pi/(pi + 2) of the area; this is the diameter.
FREE: Final = math.sqrt(math.pi / (math.pi + 2.0))

MODEL: Final = Published(
    gives="discharge coefficient of a sharp-edged hole in a thin plate, its pressure, its flow",
    holds="plate thinner than half a diameter, jet into gas, wide chamber; between Reynolds "
    "numbers of about 10 and 2000 only to about 20 % in flow",
    sources=("Sampson1891", "Merritt1967", "Britannica1911", "Finlayson499"),
    mark="C",
    place="sum of two limits: Sampson's creeping flow (half of it, for a jet in gas) with "
    "Poiseuille's friction, and the jet of free streamlines, pi/(pi + 2)",
    ranges=(THIN, losses.DRIVING),
    agreement="water from a hole of 12.7 mm at heads of 1 to 20 ft, 11 measured coefficients "
    "(1911): the flow comes out 0.6 % above on average, from -1.7 to +1.3 %. Creeping flow: 5 "
    "and 6 % above two computed values. Between them no points were seen; coefficients near 0.7 "
    "are remembered there [M], 10 to 20 % above this sum",
)


def _terms(viscosity: Any, d: Any, length: Any) -> tuple[Any, Any]:
    """Entry and friction along the edge, per mean speed."""
    return losses.ENTRY * viscosity / d, losses.POISEUILLE * viscosity * length / (d * d)


@physical(returns="ratio", velocity="velocity > 0")
def discharge_coefficient_thin_plate(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Discharge coefficient of a sharp-edged hole in a plate thinner than half its diameter.

    Holds in both limits, far below a Reynolds number of 10 and above some 2000; between them the
    sum of the two is a low estimate of the coefficient, by up to about 20 %.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    velocity : float or array
        Mean speed in the hole, flow over its area [m/s].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    nozzle_length : float or array
        Thickness of the plate at the hole [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens for a plate thicker than half a diameter.

    Returns
    -------
    float or array
        Flow over that of a loss-free jet as wide as the hole [-].

    Raises
    ------
    OutOfRange
        For a thicker plate, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``1/Cd^2 = ((pi + 2)/pi)^2 + (6 pi + 64 L/d)/Re`` [C]. The first term is the area ratio of a
    jet bounded by free streamlines, exact for a slot and within 2 % of round holes measured at
    high Reynolds number; the second Sampson's exact creeping flow, half of it because there is
    gas behind the plate, with Poiseuille's friction along the edge.

    References
    ----------
    R. A. Sampson, Phil. Trans. R. Soc. A 182 (1891) 449-518, doi:10.1098/rsta.1891.0012.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> for velocity in (0.02, 20.0):
    ...     cd = nozzle.discharge_coefficient_thin_plate(998.2, 1e-3, velocity, 1e-4, 2e-5)
    ...     print(f"{cd:.3f}")
    0.232
    0.609
    """
    d: Any = nozzle_diameter
    mask = outside_mask("discharge_coefficient_thin_plate", outside, (nozzle_length / d, THIN))
    entry, friction = _terms(viscosity, d, nozzle_length)
    loss = 1.0 / FREE**4 + 2.0 * (entry + friction) / (density * velocity)
    result: float = blank_outside(loss**-0.5, mask)
    return result


@physical(returns=losses.PARTS, contraction="ratio > 0")
def pressure_thin_plate(
    density: float,
    viscosity: float,
    surface_tension: float,
    flow: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = FREE,
    outside: Outside = "raise",
) -> NozzlePressure:
    """Gauge pressure that drives a flow through a sharp-edged hole in a thin plate, in its parts.

    Holds as `discharge_coefficient_thin_plate` does.

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
        Thickness of the plate at the hole [m].
    contraction : float or array, keyword-only
        Diameter of the jet over that of the hole [-]; 0.782 by default.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens for a plate thicker than half a diameter.

    Returns
    -------
    NozzlePressure
        ``total``, ``kinetic``, ``entry``, ``viscous`` and ``capillary`` [Pa].

    Raises
    ------
    OutOfRange
        For a thicker plate, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``kinetic = rho U_jet^2/2`` with ``U_jet = U/c^2``, ``entry = 3 pi mu U/d``, ``viscous = 32 mu
    L U/d^2``, ``capillary = 2 gamma/(c d)`` [C]; U is the mean speed in the hole, c the
    contraction in diameter.

    References
    ----------
    R. A. Sampson, Phil. Trans. R. Soc. A 182 (1891) 449-518, doi:10.1098/rsta.1891.0012.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> print(f"{nozzle.pressure_thin_plate(*water, '6 mL/min', '0.1 mm', '20 um').total:.0f}")
    221 kilopascal
    """
    d: Any = nozzle_diameter
    mask = outside_mask("pressure_thin_plate", outside, (nozzle_length / d, THIN))
    velocity = losses.mean_velocity(flow, d)
    entry, friction = _terms(viscosity, d, nozzle_length)
    kinetic = 0.5 * density * velocity * velocity / contraction**4
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    return losses.nozzle_pressure(
        kinetic, entry * velocity, friction * velocity, capillary, mask, blank_outside
    )


@physical(
    returns="flow",
    gauge_pressure="gauge_pressure > 0",
    contraction="ratio > 0",
)
def flow_thin_plate(
    density: float,
    viscosity: float,
    surface_tension: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = FREE,
    outside: Outside = "raise",
) -> float:
    """Flow through a sharp-edged hole in a thin plate: inverse of `pressure_thin_plate`.

    Holds as `discharge_coefficient_thin_plate` does.

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
        Thickness of the plate at the hole [m].
    contraction : float or array, keyword-only
        Diameter of the jet over that of the hole [-]; 0.782 by default.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens for a plate thicker than half a diameter, or where surface tension holds the
        liquid back: there is no flow then, NaN.

    Returns
    -------
    float or array
        Volume flow [m3/s].

    Raises
    ------
    OutOfRange
        For a thicker plate or a pressure below the capillary one, unless `outside` says
        otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The positive root of the quadratic in U of `pressure_thin_plate`.

    References
    ----------
    R. A. Sampson, Phil. Trans. R. Soc. A 182 (1891) 449-518, doi:10.1098/rsta.1891.0012.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> print(f"{nozzle.flow_thin_plate(*water, '221 kPa', '0.1 mm', '20 um'):.2f}")
    6.00 milliliter / minute
    """
    d: Any = nozzle_diameter
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    mask = outside_mask(
        "flow_thin_plate",
        outside,
        (nozzle_length / d, THIN),
        (gauge_pressure / capillary, losses.DRIVING),
    )
    entry, friction = _terms(viscosity, d, nozzle_length)
    drive = losses.driving_pressure(gauge_pressure, capillary)
    velocity = losses.quadratic_velocity(0.5 * density / contraction**4, entry + friction, drive)
    result: float = blank_outside(losses.volume_flow(velocity, d), mask)
    return result
