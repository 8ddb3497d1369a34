"""Waves that grow along a viscous jet from a source of one frequency: the full relation."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.jet._absolute_threshold import threshold_speed
from dropkit.models.jet._complex_relation import spatial_wave
from dropkit.models.jet.spatial_waves_inviscid import SpatialGrowth, as_wave
from dropkit.models.published import Published, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["spatial_growth_viscous"]

# Rounding must not put the cut-off itself out of range.
_ROUNDING: Final = 1e-12
CARRIED: Final = Range(1.0, math.inf, "the speed over that at which waves grow in place", "")
GROWING: Final = Range(0.0, 1.0 + _ROUNDING, "the reduced frequency pi d f / velocity", "")

MODEL: Final = Published(
    gives="growth per length and wavelength of a wave from a source of one frequency, at any viscosity",
    holds="Newtonian liquid, gas Weber number far below 1, uniform velocity, small waves, a jet "
    "that carries its waves away",
    sources=("KellerRubinowTu1973", "Chandrasekhar1961", "LeibGoldstein1986"),
    mark="C",
    place="the full viscous relation with w = i (k U - 2 pi f)",
    ranges=(CARRIED, GROWING),
    agreement="the printed relation holds at the roots to 1e-12; tends to temporal growth over speed "
    "for fast jets; no measured growth was found",
)


@physical(returns=("wavenumber", "length"), velocity="velocity > 0")
def spatial_growth_viscous(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    frequency: float,
    *,
    outside: Outside = "raise",
) -> SpatialGrowth:
    """Growth along a viscous jet of the wave that a source of one frequency makes.

    Holds for Newtonian liquids of any viscosity in still gas, above the speed at which the jet
    turns from absolutely to convectively unstable (`absolute_instability_velocity_viscous`): below
    it waves grow in place and the jet drips.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    frequency : float or array
        Frequency of the source [Hz].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens at a lower speed, where no such wave exists, and above the frequency of the
        cut-off, ``U/(pi d)``; "warn" and "allow" give what the search finds, or NaN.

    Returns
    -------
    SpatialGrowth
        ``growth_per_length`` [1/m] and ``wavelength`` [m].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The complex k that solves the relation of `growth_rate_viscous_full` with
    ``w = i (k U - 2 pi f)`` for a real frequency f [C]: ``-Im k`` is the growth, ``2 pi/Re k`` the
    wavelength. It is the root that a fast jet leads to, where ``-Im k = w/U``.

    References
    ----------
    J. B. Keller, S. I. Rubinow, Y. O. Tu, Phys. Fluids 16 (1973) 2052.
    S. J. Leib, M. E. Goldstein, Phys. Fluids 29 (1986) 952.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> ink = ("1000 kg/m3", "10 mPa*s", "50 mN/m")
    >>> wave = jet.spatial_growth_viscous(*ink, "8 m/s", "100 um", "18 kHz")
    >>> print(f"{wave.growth_per_length:.3f}, {wave.wavelength:.1f}")
    0.576 / millimeter, 443.9 micrometer
    """
    radius = 0.5 * jet_diameter
    v: Any = velocity * (density * radius / surface_tension) ** 0.5
    ohnesorge: Any = viscosity / (density * surface_tension * radius) ** 0.5
    omega: Any = 2.0 * math.pi * frequency * radius / velocity
    with np.errstate(all="ignore"):
        mask = outside_mask(
            "spatial_growth_viscous",
            outside,
            (v / threshold_speed(ohnesorge), CARRIED),
            (omega, GROWING),
        )
        shape = np.broadcast_shapes(np.shape(v), np.shape(omega), np.shape(ohnesorge))
        source, thick, speed = (
            np.broadcast_to(one, shape).astype(float).ravel() for one in (omega, ohnesorge, v)
        )
        x = spatial_wave(source, thick, speed).reshape(shape)
        growth, length = -x.imag / radius, math.pi * jet_diameter / x.real
    return as_wave(growth, length, mask)
