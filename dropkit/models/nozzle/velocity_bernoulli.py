"""Speed of a loss-free jet from its pressure, with the capillary pressure inside it."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside

__all__ = ["jet_velocity_inviscid", "pressure_inviscid_jet"]

MODEL: Final = Published(
    gives="speed of a loss-free jet from the pressure, and back",
    holds="no losses: an upper limit of the speed",
    sources=(),
    mark="C",
    place="dp = rho U^2/2 + gamma/a",
    ranges=(losses.DRIVING,),
    agreement="Bernoulli's equation and Laplace's pressure, exact",
)


@physical(returns="velocity", gauge_pressure="gauge_pressure > 0")
def jet_velocity_inviscid(
    density: float,
    surface_tension: float,
    gauge_pressure: float,
    jet_diameter: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Speed of a loss-free jet from the gauge pressure.

    Holds without losses; real jets are slower. Where the pressure does not exceed that inside the
    jet, no jet leaves.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    gauge_pressure : float or array
        Pressure ahead of the nozzle, above that of the surroundings [Pa].
    jet_diameter : float or array
        Diameter of the jet [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens where surface tension holds the liquid back: there is no speed then, NaN.

    Returns
    -------
    float or array
        Speed of the jet [m/s].

    Raises
    ------
    OutOfRange
        For a pressure below ``2 gamma/d``, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``U = sqrt(2 (p - 2 gamma/d)/rho)`` [C]; ``2 gamma/d`` is gamma over the radius.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.jet_velocity_inviscid(998.0, 0.0728, 100e3, 50e-6):.4f}")
    13.9487
    """
    capillary = losses.capillary_pressure(surface_tension, jet_diameter, 1.0)
    mask = outside_mask(
        "jet_velocity_inviscid", outside, (gauge_pressure / capillary, losses.DRIVING)
    )
    drive: Any = losses.driving_pressure(gauge_pressure, capillary)
    result: float = blank_outside((2.0 * drive / density) ** 0.5, mask)
    return result


@physical(returns="gauge_pressure", velocity="velocity > 0")
def pressure_inviscid_jet(
    density: float, surface_tension: float, velocity: float, jet_diameter: float
) -> float:
    """Gauge pressure of a loss-free jet: inverse of `jet_velocity_inviscid`.

    Holds without losses: real nozzles need more.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet [m].

    Returns
    -------
    float or array
        Pressure ahead of the nozzle, above that of the surroundings [Pa].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``p = rho U^2/2 + 2 gamma/d`` [C].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(
    ...     f"{nozzle.pressure_inviscid_jet('998 kg/m3', '72.8 mN/m', '13.9487 m/s', '50 um'):.2f}"
    ... )
    100.00 kilopascal
    """
    capillary: float = losses.capillary_pressure(surface_tension, jet_diameter, 1.0)
    return 0.5 * density * velocity * velocity + capillary
