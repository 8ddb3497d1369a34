"""Pressure and flow of a hole whose discharge coefficient is known, and that coefficient."""

from __future__ import annotations

from typing import Any, Final, NamedTuple

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = [
    "CoefficientPressure",
    "discharge_coefficient_from_flow",
    "flow_from_coefficient",
    "pressure_from_coefficient",
]

# Rounding in coefficient over contraction must not put a loss-free jet out of range.
SPEED: Final = Range(0.0, 1.0 + 1e-12, "the velocity coefficient, Cd over the jet's area ratio", "")

MODEL: Final = Published(
    gives="pressure and flow of a hole with a known discharge coefficient, and that coefficient "
    "from a weighed flow",
    holds="the coefficient belongs to this hole, this liquid and about this flow",
    sources=(),
    mark="C",
    place="Q = Cd A sqrt(2 (p - 2 gamma/d_jet)/rho)",
    ranges=(SPEED, losses.DRIVING),
    agreement="the definition of the coefficient, exact",
)


class CoefficientPressure(NamedTuple):
    """The pressure that a flow needs where only a discharge coefficient is known.

    Parameters
    ----------
    total : float, array or Quantity
        Gauge pressure ahead of the nozzle, the sum of the others [Pa].
    kinetic : float, array or Quantity
        What becomes kinetic energy of the jet [Pa].
    loss : float, array or Quantity
        What is lost at the entry and by friction [Pa].
    capillary : float, array or Quantity
        The pressure inside the jet [Pa].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> parts = nozzle.pressure_from_coefficient(998.2, 0.0727, 1e-7, 1e-4, 0.8)
    >>> parts.loss < parts.kinetic < parts.total
    True
    """

    total: Any
    kinetic: Any
    loss: Any
    capillary: Any


@physical(
    returns=("gauge_pressure", "pressure", "pressure", "pressure"),
    discharge_coefficient="ratio > 0",
    contraction="ratio > 0",
)
def pressure_from_coefficient(
    density: float,
    surface_tension: float,
    flow: float,
    nozzle_diameter: float,
    discharge_coefficient: float,
    *,
    contraction: float = 1.0,
    outside: Outside = "raise",
) -> CoefficientPressure:
    """Gauge pressure that drives a flow through a hole with a known discharge coefficient.

    Holds where the coefficient was measured, or comes from one of the models of this folder.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    flow : float or array
        Volume flow through the hole [m3/s].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    discharge_coefficient : float or array
        Flow over that of a loss-free jet as wide as the hole [-].
    contraction : float or array, keyword-only
        Diameter of the jet over that of the hole [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens where the coefficient is above the jet's area over the hole's, which would
        be a jet faster than a loss-free one.

    Returns
    -------
    CoefficientPressure
        ``total``, ``kinetic``, ``loss`` and ``capillary`` [Pa].

    Raises
    ------
    OutOfRange
        For such a coefficient, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``kinetic = rho (U/c^2)^2/2``, ``loss = rho U^2/2 (1/Cd^2 - 1/c^4)``, ``capillary = 2 gamma/(c
    d)`` [C]; U is the mean speed in the hole, c the contraction in diameter.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> parts = nozzle.pressure_from_coefficient(
    ...     "998.2 kg/m3", "72.7 mN/m", "6 mL/min", "0.1 mm", 0.8
    ... )
    >>> print(f"{parts.total:.0f}, lost {parts.loss:.0f}")
    128 kilopascal, lost 46 kilopascal
    """
    d: Any = nozzle_diameter
    area: Any = contraction * contraction
    mask = outside_mask("pressure_from_coefficient", outside, (discharge_coefficient / area, SPEED))
    velocity = losses.mean_velocity(flow, d)
    head = 0.5 * density * velocity * velocity
    kinetic = head / (area * area)
    loss = head / (discharge_coefficient * discharge_coefficient) - kinetic
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    nothing = 0.0 * loss + 0.0 * capillary
    parts = [blank_outside(part + nothing, mask) for part in (kinetic, loss, capillary)]
    return CoefficientPressure(parts[0] + parts[1] + parts[2], *parts)


@physical(
    returns="flow",
    gauge_pressure="gauge_pressure > 0",
    discharge_coefficient="ratio > 0",
    contraction="ratio > 0",
)
def flow_from_coefficient(
    density: float,
    surface_tension: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    discharge_coefficient: float,
    *,
    contraction: float = 1.0,
    outside: Outside = "raise",
) -> float:
    """Flow through a hole with a known discharge coefficient: inverse of `pressure_from_coefficient`.

    Holds where the coefficient was measured, or comes from one of the models of this folder.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    gauge_pressure : float or array
        Pressure ahead of the nozzle, above that of the surroundings [Pa].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    discharge_coefficient : float or array
        Flow over that of a loss-free jet as wide as the hole [-].
    contraction : float or array, keyword-only
        Diameter of the jet over that of the hole [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens for a coefficient above the jet's area ratio, or where surface tension holds
        the liquid back: there is no flow then, NaN.

    Returns
    -------
    float or array
        Volume flow [m3/s].

    Raises
    ------
    OutOfRange
        For such a coefficient or pressure, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Q = Cd A sqrt(2 (p - 2 gamma/(c d))/rho)`` [C].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> flow = nozzle.flow_from_coefficient("998.2 kg/m3", "72.7 mN/m", "128 kPa", "0.1 mm", 0.8)
    >>> print(f"{flow:.2f}")
    6.00 milliliter / minute
    """
    d: Any = nozzle_diameter
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    mask = outside_mask(
        "flow_from_coefficient",
        outside,
        (discharge_coefficient / (contraction * contraction), SPEED),
        (gauge_pressure / capillary, losses.DRIVING),
    )
    drive = losses.driving_pressure(gauge_pressure, capillary)
    velocity = discharge_coefficient * (2.0 * drive / density) ** 0.5
    result: float = blank_outside(losses.volume_flow(velocity, d), mask)
    return result


@physical(returns="ratio", gauge_pressure="gauge_pressure > 0", contraction="ratio > 0")
def discharge_coefficient_from_flow(
    density: float,
    surface_tension: float,
    flow: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    *,
    contraction: float = 1.0,
    outside: Outside = "raise",
) -> float:
    """Discharge coefficient of a hole from a weighed flow at a known pressure.

    Holds for this liquid and about this flow only.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    flow : float or array
        Volume flow through the hole [m3/s].
    gauge_pressure : float or array
        Pressure ahead of the nozzle, above that of the surroundings [Pa].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    contraction : float or array, keyword-only
        Diameter of the jet over that of the hole [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens where the coefficient comes out above the jet's area ratio (the hole is wider
        or the pressure higher than stated, or the pressure is absolute), or where surface tension
        holds the liquid back.

    Returns
    -------
    float or array
        The coefficient [-].

    Raises
    ------
    OutOfRange
        For such a result or pressure, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Cd = Q/(A sqrt(2 (p - 2 gamma/(c d))/rho))`` [C].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> weighed = ("998.2 kg/m3", "72.7 mN/m", "6 mL/min", "128 kPa", "0.1 mm")
    >>> print(f"{nozzle.discharge_coefficient_from_flow(*weighed):.2f}")
    0.80
    """
    d: Any = nozzle_diameter
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    pushed = outside_mask(
        "discharge_coefficient_from_flow", outside, (gauge_pressure / capillary, losses.DRIVING)
    )
    drive = losses.driving_pressure(gauge_pressure, capillary)
    found = losses.mean_velocity(flow, d) / (2.0 * drive / density) ** 0.5
    mask = outside_mask(
        "discharge_coefficient_from_flow", outside, (found / (contraction * contraction), SPEED)
    )
    result: float = blank_outside(found, pushed | mask)
    return result
