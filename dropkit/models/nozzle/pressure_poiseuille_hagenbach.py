"""Pressure and flow of a long tube in laminar flow: Poiseuille's law with Hagenbach's term."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.nozzle import _losses as losses
from dropkit.models.nozzle._losses import NozzlePressure
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["flow_laminar_tube", "pressure_laminar_tube"]

# Merritt takes the developed form below this and the developing one above it [S2].
DEVELOPED: Final = Range(0.0, 50.0, "the Reynolds number times diameter over length", "")

MODEL: Final = Published(
    gives="pressure of a long tube in laminar flow, and back",
    holds="Newtonian liquid, tube long enough that the profile is parabolic over most of it, jet "
    "into gas",
    sources=("Merritt1967", "Sampson1891", "Finlayson499", "MechanicalEngineersHandbook"),
    mark="S2",
    place="dp/(rho U^2/2) = 2.28 + 64 L/(d Re) as Merritt's short-tube coefficient is quoted; "
    "3 pi mu U/d at the entry is half of Sampson's thin plate [C]",
    ranges=(losses.LAMINAR, DEVELOPED, losses.DRIVING),
    agreement="no measured points were seen. Against other sources: the constant is 2.28 here, "
    "2.30 in a handbook, 2.25 in Shah's theory; creeping flow through plates 0.10 and 0.37 "
    "diameters thick lies 5 and 6 % above the two computed values seen",
)


@physical(
    returns=losses.PARTS,
    contraction="ratio > 0",
    entry_loss="ratio >= 0",
)
def pressure_laminar_tube(
    density: float,
    viscosity: float,
    surface_tension: float,
    flow: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = 1.0,
    entry_loss: float = 0.28,
    outside: Outside = "raise",
) -> NozzlePressure:
    """Gauge pressure that drives a laminar flow through a long tube, in its parts.

    Holds for Newtonian liquids, a Reynolds number up to 2100, and a product of Reynolds number
    and diameter over length up to 50, so that the profile is parabolic over most of the tube.

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
        What is lost at the entry, in units of ``rho U^2/2``, beside the viscous loss there [-].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside those ranges.

    Returns
    -------
    NozzlePressure
        ``total``, ``kinetic``, ``entry``, ``viscous`` and ``capillary`` [Pa].

    Raises
    ------
    OutOfRange
        For a turbulent flow, or a tube too short for it, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``kinetic = rho U^2`` (twice rho U^2/2, for the parabola) [C], ``entry = k rho U^2/2 +
    3 pi mu U/d``, ``viscous = 32 mu L U/d^2`` [C], ``capillary = 2 gamma/d_jet``; U is the mean
    speed in the tube, k = 0.28 so that both first terms make Merritt's 2.28 [S2].

    References
    ----------
    H. E. Merritt, Hydraulic Control Systems, Wiley 1967, as quoted in a textbook.
    R. A. Sampson, Phil. Trans. R. Soc. A 182 (1891) 449-518, doi:10.1098/rsta.1891.0012.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> parts = nozzle.pressure_laminar_tube(*water, "1 mL/min", "60 um", "2 mm")
    >>> print(", ".join(f"{name} {part.magnitude:.1f}" for name, part in parts._asdict().items()))
    total 147.7, kinetic 34.7, entry 5.8, viscous 104.8, capillary 2.4
    """
    d: Any = nozzle_diameter
    velocity = losses.mean_velocity(flow, d)
    reynolds = density * velocity * d / viscosity
    mask = outside_mask(
        "pressure_laminar_tube",
        outside,
        (reynolds, losses.LAMINAR),
        (reynolds * d / nozzle_length, DEVELOPED),
    )
    kinetic = density * velocity * velocity
    entry = 0.5 * entry_loss * kinetic + losses.ENTRY * viscosity * velocity / d
    viscous = losses.POISEUILLE * viscosity * nozzle_length * velocity / (d * d)
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    return losses.nozzle_pressure(kinetic, entry, viscous, capillary, mask, blank_outside)


@physical(
    returns="flow",
    gauge_pressure="gauge_pressure > 0",
    contraction="ratio > 0",
    entry_loss="ratio >= 0",
)
def flow_laminar_tube(
    density: float,
    viscosity: float,
    surface_tension: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    contraction: float = 1.0,
    entry_loss: float = 0.28,
    outside: Outside = "raise",
) -> float:
    """Laminar flow through a long tube from the gauge pressure: inverse of `pressure_laminar_tube`.

    Holds for Newtonian liquids, a Reynolds number up to 2100, and a product of Reynolds number
    and diameter over length up to 50.

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
        What is lost at the entry, in units of ``rho U^2/2``, beside the viscous loss there [-].
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
        For a turbulent flow, a tube too short for it, or a pressure below the capillary one,
        unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The positive root of the quadratic in U of `pressure_laminar_tube`, written so that no digits
    are lost where viscosity rules.

    References
    ----------
    H. E. Merritt, Hydraulic Control Systems, Wiley 1967, as quoted in a textbook.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> print(f"{nozzle.flow_laminar_tube(*water, '147.7 kPa', '60 um', '2 mm'):.3f}")
    1.000 milliliter / minute
    """
    d: Any = nozzle_diameter
    capillary = losses.capillary_pressure(surface_tension, d, contraction)
    pushed = outside_mask(
        "flow_laminar_tube", outside, (gauge_pressure / capillary, losses.DRIVING)
    )
    linear = losses.ENTRY * viscosity / d + losses.POISEUILLE * viscosity * nozzle_length / (d * d)
    drive = losses.driving_pressure(gauge_pressure, capillary)
    velocity = losses.quadratic_velocity(0.5 * density * (2.0 + entry_loss), linear, drive)
    reynolds = density * velocity * d / viscosity
    mask = outside_mask(
        "flow_laminar_tube",
        outside,
        (reynolds, losses.LAMINAR),
        (reynolds * d / nozzle_length, DEVELOPED),
    )
    result: float = blank_outside(losses.volume_flow(velocity, d), pushed | mask)
    return result
