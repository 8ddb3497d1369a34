"""What a modulated pressure makes of a jet's speed: quasi-steady, with the inertia of the hole."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["velocity_amplitude_from_pressure"]

MODEL: Final = Published(
    gives="amplitude of the speed in a nozzle from that of the pressure before it",
    holds="small modulation, laminar flow, straight round hole much shorter than the sound wave in "
    "the liquid; the pressure is that at the entry of the hole, not that of a drive",
    sources=(),
    mark="C",
    place="V = P/|K rho U + i w rho l I0(q)/I2(q)|, q = (d/2) (i w rho/mu)^(1/2)",
    agreement="closed limits only; no measured response of a nozzle was found",
)


def impedance_factor(q: Any) -> Any:
    """q^2 I0(q)/I2(q) for complex q of positive real part: 8 for slow flow, q^2 for fast."""
    from scipy.special import ive

    squared = q * q
    small = np.abs(q) < 1e-2
    safe = np.where(small, 1.0, q)
    return np.where(small, 8.0 + 4.0 / 3.0 * squared, safe * safe * (ive(0, safe) / ive(2, safe)))


@physical(
    returns="velocity",
    velocity="velocity > 0",
    nozzle_length="length > 0",
    pressure_amplitude="pressure > 0",
    kinetic_factor="ratio > 0",
)
def velocity_amplitude_from_pressure(
    density: float,
    viscosity: float,
    velocity: float,
    nozzle_diameter: float,
    nozzle_length: float,
    frequency: float,
    pressure_amplitude: float,
    *,
    kinetic_factor: float = 1.0,
) -> float:
    """Amplitude of the speed in a nozzle from the amplitude of the pressure before it.

    Holds for small modulation of laminar flow in a straight round hole, much shorter than the
    sound wave (below 1 mm at 100 kHz in water). At low frequency the flow follows the steady
    curve of pressure against speed; in a long hole at high frequency it follows less and less,
    because the liquid in it has to be accelerated.

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
        Length of the hole [m].
    frequency : float or array
        Drive frequency [Hz].
    pressure_amplitude : float or array
        Amplitude, middle to peak, of the pressure at the entry of the hole [Pa].
    kinetic_factor : float or array, keyword-only
        K in the steady ``K rho U^2/2 + 32 mu l U/d^2`` [-]; 1, the default, for a short hole
        without loss. Over 2 where a parabolic profile leaves the hole.

    Returns
    -------
    float or array
        Amplitude of the mean speed in the hole [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``P = |K rho U + Z| V`` [C]: the slope of the steady kinetic term, and
    ``Z = i w rho l I0(q)/I2(q)``, ``q = (d/2) (i w rho/mu)^(1/2)``, the exact response of laminar
    flow in a tube to a pressure that oscillates at ``w = 2 pi f`` (from the equation of motion;
    known by the name of Womersley, 1955 [M]). Slow: ``Z`` is 32 mu l/d^2, and the whole the slope
    of the steady curve; fast: ``i w rho l``, the inertance, with a thin layer at the wall. The
    corner lies near ``2 pi f l = K U``. Left out: the liquid that moves outside both ends of the
    hole (a longer `nozzle_length` can stand for it), the wave of capillary pressure, the profile's
    effect on K, and everything between a drive and this pressure: resonance of the chamber
    decides there.

    The relative amplitude of the jet's speed is the same: a jet that contracts to ``d_j`` has
    ``(d/d_j)^2`` times this amplitude.

    Examples
    --------
    A tenth of a bar on 3 bar, in a short and in a long hole at 60 kHz:

    >>> from dropkit.models import jet
    >>> amplitude = jet.velocity_amplitude_from_pressure
    >>> print(f"{amplitude(1050.0, 4e-3, 20.0, 60e-6, 30e-6, 60e3, 1e4):.3f}")
    0.372
    >>> print(f"{amplitude(1050.0, 4e-3, 20.0, 60e-6, 300e-6, 60e3, 1e4):.3f}")
    0.070
    """
    omega = 2.0 * math.pi * frequency
    squared: Any = 0.25 * nozzle_diameter * nozzle_diameter * (omega * density / viscosity)
    viscous: Any = 4.0 * viscosity * nozzle_length / (nozzle_diameter * nozzle_diameter)
    with np.errstate(all="ignore"):
        q = np.sqrt(np.asarray(squared)) * complex(math.sqrt(0.5), math.sqrt(0.5))
        response = np.abs(kinetic_factor * density * velocity + viscous * impedance_factor(q))
        result: Any = pressure_amplitude / response
    return result if np.ndim(result) else float(result)
