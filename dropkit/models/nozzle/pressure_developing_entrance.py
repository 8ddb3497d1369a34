"""Pressure and flow of a tube in whose laminar flow the profile is still developing."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.nozzle._losses import NozzlePressure
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside

__all__ = ["flow_developing_tube", "pressure_developing_tube"]

MODEL: Final = Published(
    gives="pressure of a tube of any length in laminar flow, and back",
    holds="Newtonian liquid, entry well rounded (or its loss given), jet into gas",
    sources=("Shah1978", "Merritt1967", "Sampson1891"),
    mark="M+",
    place="f Re = 3.44/sqrt(x) + (1.25/(4x) + 16 - 3.44/sqrt(x))/(1 + 0.00021/x^2), "
    "x = L/(d Re), from memory; checks: 4 x 3.44 = 13.76 against Merritt's 13.74 for short tubes, "
    "1 + 1.25 against his 2.28 for long ones, both seen quoted; its abstract states 2.4 %",
    ranges=(losses.LAMINAR, losses.DRIVING),
    agreement="no measured points were seen; the paper's abstract states 2.4 % against exact "
    "solutions. With a sharp entry (entry_loss 0.5) its loss lies within 1 % of Merritt's "
    "short-tube form where Re d/L is above 400, and 11 % above it at 50, where that form ends",
)


def _friction(x: Any) -> tuple[Any, Any]:
    """Friction with the growth of momentum, and its derivative by ln x; x = L/(d Re)."""
    root = 13.76 * x**0.5
    excess = 1.25 + 64.0 * x - root
    blend = 0.00021 / (x * x)
    damped = 1.0 + blend
    value = root + excess / damped
    slope = 0.5 * root + (64.0 * x - 0.5 * root) / damped + excess * 2.0 * blend / damped**2
    return value, slope


@physical(
    returns=losses.PARTS,
    contraction="ratio > 0",
    entry_loss="ratio >= 0",
)
def pressure_developing_tube(
    density: float,
    viscosity: float,
    surface_tension: float,
    flow: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = 1.0,
    entry_loss: float = 0.0,
    outside: Outside = "raise",
) -> NozzlePressure:
    """Gauge pressure that drives a laminar flow through a tube of any length, in its parts.

    Holds for Newtonian liquids and a Reynolds number up to 2100; from short tubes, in which only a
    layer at the wall is slowed down, to long ones, where it gives `pressure_laminar_tube`.

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
        What is lost at the entry, in units of ``rho U^2/2``: 0 for a rounded one, about 0.5 for a
        sharp edge [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above a Reynolds number of 2100.

    Returns
    -------
    NozzlePressure
        ``total``, ``kinetic``, ``entry``, ``viscous`` and ``capillary`` [Pa]; what the growth of
        the profile takes stands under ``viscous``.

    Raises
    ------
    OutOfRange
        For a larger Reynolds number, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``kinetic = rho U^2/2``, ``entry = k rho U^2/2 + 3 pi mu U/d``, ``viscous = rho U^2/2 [13.76
    x^0.5 + (1.25 + 64 x - 13.76 x^0.5)/(1 + 0.00021/x^2)]`` with ``x = L/(d Re)`` (Shah) [M+],
    ``capillary = 2 gamma/d_jet``; U is the mean speed in the tube.

    References
    ----------
    R. K. Shah, J. Fluids Eng. 100 (1978) 177; abstract seen.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> parts = nozzle.pressure_developing_tube(*water, "2 mL/min", "60 um", "0.3 mm")
    >>> print(f"{parts.total:.0f}, friction {parts.viscous:.0f}")
    161 kilopascal, friction 88 kilopascal
    """
    d: Any = nozzle_diameter
    velocity = losses.mean_velocity(flow, d)
    reynolds = density * velocity * d / viscosity
    mask = outside_mask("pressure_developing_tube", outside, (reynolds, losses.LAMINAR))
    kinetic = 0.5 * density * velocity * velocity
    entry = entry_loss * kinetic + losses.ENTRY * viscosity * velocity / d
    viscous = kinetic * _friction(nozzle_length / (d * reynolds))[0]
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    return losses.nozzle_pressure(kinetic, entry, viscous, capillary, mask, blank_outside)


@physical(
    returns="flow",
    gauge_pressure="gauge_pressure > 0",
    contraction="ratio > 0",
    entry_loss="ratio >= 0",
)
def flow_developing_tube(
    density: float,
    viscosity: float,
    surface_tension: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = 1.0,
    entry_loss: float = 0.0,
    outside: Outside = "raise",
) -> float:
    """Laminar flow through a tube of any length: inverse of `pressure_developing_tube`.

    Holds for Newtonian liquids and a Reynolds number up to 2100.

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
        What is lost at the entry, in units of ``rho U^2/2``: 0 for a rounded one, about 0.5 for a
        sharp edge [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above a Reynolds number of 2100, or where surface tension holds the liquid
        back: there is no flow then, NaN.

    Returns
    -------
    float or array
        Volume flow [m3/s].

    Raises
    ------
    OutOfRange
        For a larger Reynolds number or a pressure below the capillary one, unless `outside` says
        otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    Newton's method on the logarithm of the Reynolds number, kept inside a bracket; pressure rises
    with flow, so there is one root.

    References
    ----------
    R. K. Shah, J. Fluids Eng. 100 (1978) 177; abstract seen.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> print(f"{nozzle.flow_developing_tube(*water, '161.3 kPa', '60 um', '0.3 mm'):.2f}")
    2.00 milliliter / minute
    """
    d: Any = nozzle_diameter
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    pushed = outside_mask(
        "flow_developing_tube", outside, (gauge_pressure / capillary, losses.DRIVING)
    )
    drive = losses.driving_pressure(gauge_pressure, capillary)
    # Reynolds number of the loss-free jet: Re^2 times the loss is its square.
    target = losses.logarithm(2.0 * drive * density * d * d / (viscosity * viscosity))

    def excess(y: Any) -> tuple[Any, Any]:
        reynolds = losses.exponential(y)
        friction, slope = _friction(nozzle_length / (d * reynolds))
        creeping = 2.0 * losses.ENTRY / reynolds
        loss = 1.0 + entry_loss + friction + creeping
        return 2.0 * y + losses.logarithm(loss) - target, 2.0 - (slope + creeping) / loss

    reynolds = losses.exponential(losses.increasing_root(excess, 0.5 * target))
    mask = outside_mask("flow_developing_tube", outside, (reynolds, losses.LAMINAR))
    velocity = reynolds * viscosity / (density * d)
    result: float = blank_outside(losses.volume_flow(velocity, d), pushed | mask)
    return result
