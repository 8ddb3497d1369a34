"""Waves that grow along an inviscid jet from a source of one frequency: Keller, Rubinow & Tu 1973."""

from __future__ import annotations

import math
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.boundary import physical
from dropkit.models.jet._complex_relation import (
    V_CRITICAL,
    inviscid_spatial_wave,
    inviscid_turning_point,
)
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["SpatialGrowth", "spatial_growth_inviscid"]

CARRIED: Final = Range(
    V_CRITICAL**2,
    math.inf,
    "the Weber number of the liquid on the jet radius (twice as much on its diameter)",
    "",
)
GROWING: Final = Range(0.0, 1.0, "the frequency over the highest that grows along the jet", "")

MODEL: Final = Published(
    gives="growth per length and wavelength of a wave from a source of one frequency, inviscid",
    holds="Ohnesorge number far below 1, gas Weber number far below 1, uniform velocity, small "
    "waves, a jet that carries its waves away",
    sources=("KellerRubinowTu1973", "Rayleigh1878"),
    mark="C",
    place="Rayleigh's relation with w = i (k U - 2 pi f)",
    ranges=(CARRIED, GROWING),
    agreement="at Rayleigh's fastest wave above temporal growth over speed by 0.46 over the Weber "
    "number on the radius, 10 % at 5, 1 % at 46; no measured growth was found",
)


class SpatialGrowth(NamedTuple):
    """A wave downstream of a source of one frequency.

    Parameters
    ----------
    growth_per_length : float, array or Quantity
        Amplitudes grow as exp(growth per length x distance) [1/m].
    wavelength : float, array or Quantity
        Length of the wave along the jet [m].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> wave = jet.spatial_growth_inviscid(1000.0, 0.05, 8.0, 1e-4, 18e3)
    >>> f"{1e-3 * wave.growth_per_length:.2f} per mm"
    '0.86 per mm'
    """

    growth_per_length: Any
    wavelength: Any


@physical(returns=("wavenumber", "length"), velocity="velocity > 0")
def spatial_growth_inviscid(
    density: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    frequency: float,
    *,
    outside: Outside = "raise",
) -> SpatialGrowth:
    """Growth along an inviscid jet of the wave that a source of one frequency makes.

    Holds for thin liquids (Ohnesorge number far below 1) in still gas, above the speed at which
    the jet turns from absolutely to convectively unstable (Weber number on the RADIUS of 3.12255,
    6.245 on the diameter): below it waves grow in place and the jet drips.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    frequency : float or array
        Frequency of the source [Hz].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens at a lower Weber number, where no such wave exists, and above the highest
        frequency that grows; "warn" and "allow" give what the search finds, or NaN.

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
    The complex k that solves ``w^2 = gamma/(rho a^3) x (1 - x^2) I1(x)/I0(x)``, ``x = k a``, with
    ``w = i (k U - 2 pi f)`` for a real frequency f [C]: ``-Im k`` is the growth, ``2 pi/Re k`` the
    wavelength. It is the root that a fast jet leads to, where ``-Im k = w/U``. Growth ends a
    little below the frequency ``U/(pi d)``: by 0.223 over the Weber number on the radius, in parts
    of one, where that number is high.

    References
    ----------
    J. B. Keller, S. I. Rubinow, Y. O. Tu, Phys. Fluids 16 (1973) 2052.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> wave = jet.spatial_growth_inviscid("1000 kg/m3", "50 mN/m", "8 m/s", "100 um", "18 kHz")
    >>> print(f"{wave.growth_per_length:.3f}, {wave.wavelength:.1f}")
    0.864 / millimeter, 444.4 micrometer
    """
    radius = 0.5 * jet_diameter
    weber: Any = density * velocity * velocity * radius / surface_tension
    omega: Any = 2.0 * math.pi * frequency * radius / velocity
    shape = np.broadcast_shapes(np.shape(weber), np.shape(omega))
    v, source = (np.atleast_1d(one).astype(float) for one in np.broadcast_arrays(weber**0.5, omega))
    with np.errstate(all="ignore"):
        highest = inviscid_turning_point(np.maximum(v, V_CRITICAL).ravel())[1].reshape(v.shape)
        against = (source / highest).reshape(shape)
        mask = outside_mask(
            "spatial_growth_inviscid",
            outside,
            (weber, CARRIED),
            (against if shape else float(against), GROWING),
        )
        x = inviscid_spatial_wave(source.ravel(), v.ravel()).reshape(shape)
        growth, length = -x.imag / radius, math.pi * jet_diameter / x.real
    return as_wave(growth, length, mask)


def as_wave(growth: Any, length: Any, mask: Any) -> SpatialGrowth:
    """Both results as floats where they are single, NaN where the policy says so."""
    if np.ndim(growth) == 0:
        growth, length = float(growth), float(length)
    return SpatialGrowth(blank_outside(growth, mask), blank_outside(length, mask))
