"""Breakup length of a driven jet from the amplitude of its radius, its speed or its pressure."""

from __future__ import annotations

import math
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.boundary import physical
from dropkit.errors import BadInput
from dropkit.models.jet.radius_amplitude_velocity import damping_and_drive
from dropkit.models.jet.velocity_amplitude_pressure import velocity_amplitude_from_pressure
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["StimulatedBreakup", "stimulated_breakup_length"]

LINEAR: Final = Range(0.0, 0.2 * (1.0 + 1e-12), "the radius amplitude over the jet radius", "")
_ROUNDING: Final = 1e-12
GROWING: Final = Range(0.0, 1.0 + _ROUNDING, "the reduced wavenumber pi d / wavelength", "")
# Newton's steps for the time; most cases need two, amplitudes near the radius itself eleven.
_STEPS: Final = 12

MODEL: Final = Published(
    gives="breakup length and time of a driven jet, from one of three amplitudes",
    holds="small waves (amplitude below a fifth of the radius), one frequency, jet Weber number far "
    "above 1, drive above the natural disturbances",
    sources=("Weber1931", "Denner2022"),
    mark="C",
    place="L = U t, eps/a (exp(w+ t) - exp(w- t)) = 1",
    ranges=(GROWING, LINEAR),
    agreement="direct simulations of Denner et al. 2022 (speed modulated, Ohnesorge number 0.1 on "
    "the radius), the 2 of 22 within the range: 10 % and 11 % too short; with amplitudes of "
    "0.2 to 0.35 of the radius 9 to 26 % too short; driven jets: no measured points were seen",
)


class StimulatedBreakup(NamedTuple):
    """Where and when a driven jet breaks.

    Parameters
    ----------
    length : float, array or Quantity
        Length of the jet from the nozzle to where it breaks [m].
    time : float, array or Quantity
        Time that the liquid takes for it [s].
    radius_amplitude : float, array or Quantity
        Amplitude of the growing wave of the radius at the nozzle [m]; above a fifth of the jet's
        radius growth is not linear.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> ink, drive = (1050.0, 4e-3, 0.042), {"velocity_amplitude": 0.05}
    >>> found = jet.stimulated_breakup_length(*ink, 20.0, 60e-6, 280e-6, **drive)
    >>> found.length == 20.0 * found.time
    True
    """

    length: Any
    time: Any
    radius_amplitude: Any


@physical(
    returns=("distance", "time", "length"),
    velocity="velocity > 0",
    radius_amplitude="length > 0",
    velocity_amplitude="velocity > 0",
    pressure_amplitude="pressure > 0",
    nozzle_length="length > 0",
    kinetic_factor="ratio > 0",
    growth_rate="growth_rate > 0",
)
def stimulated_breakup_length(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    wavelength: float,
    *,
    radius_amplitude: float | None = None,
    velocity_amplitude: float | None = None,
    pressure_amplitude: float | None = None,
    nozzle_diameter: float | None = None,
    nozzle_length: float | None = None,
    kinetic_factor: float | None = None,
    growth_rate: float | None = None,
    outside: Outside = "raise",
) -> StimulatedBreakup:
    """Breakup length of a driven jet from the amplitude of its radius, speed or pressure.

    Holds for small waves of one frequency that grow at one rate all the way, on a jet much
    faster than its capillary waves. Give exactly one amplitude, middle to peak: the three mean
    different things, and to take one per cent of the speed for one per cent of the radius about
    doubles the length of a fast thin jet. A drive weaker than the rig's own disturbances doesn't
    decide: compare with `natural_breakup_length`.

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
    wavelength : float or array
        Length of the wave along the jet, speed over drive frequency [m].
    radius_amplitude : float or array, keyword-only
        Amplitude of the growing wave of the jet's radius at the nozzle [m].
    velocity_amplitude : float or array, keyword-only
        Amplitude of the jet's speed at the nozzle [m/s].
    pressure_amplitude : float or array, keyword-only
        Amplitude of the pressure at the entry of the hole [Pa]; needs `nozzle_length`.
    nozzle_diameter : float or array, keyword-only
        Diameter of the hole [m], for a pressure amplitude; that of the jet by default.
    nozzle_length : float or array, keyword-only
        Length of the hole [m], for a pressure amplitude.
    kinetic_factor : float or array, keyword-only
        For a pressure amplitude, see `velocity_amplitude_from_pressure` [-]; 1 by default.
    growth_rate : float or array, keyword-only
        Growth rate of the driven wave by a relation of your choice [1/s]; by default that of
        `growth_rate_viscous_longwave`.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens below the cut-off, where no wave grows, and for an amplitude of the radius
        above 0.2 of it, where growth is no longer linear.

    Returns
    -------
    StimulatedBreakup
        ``length`` [m], ``time`` [s] and ``radius_amplitude`` [m].

    Raises
    ------
    BadInput
        For none or more than one amplitude, or a nozzle that doesn't fit the amplitude.
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    From a radius: ``t = ln(a/eps)/w+``. From a speed: the wave begins at zero and is the difference
    of a growing and a decaying one, ``eps/a (exp(w+ t) - exp(w- t)) = 1`` with ``eps`` of
    `radius_amplitude_from_velocity` and ``w- = -(w+ + 3 nu k^2)``; without viscosity
    ``t = asinh(a/(2 eps))/w+``. From a pressure: the speed of `velocity_amplitude_from_pressure`
    first. ``L = U t`` [C]. An amplitude of the radius as large as the radius leaves no jet to
    break: NaN, with one warning. The end, when the wave is no longer small, is taken as if it were:
    direct simulations with modulated speed break 11 to 13 % later within the range.

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.
    F. Denner et al., Flow Turbul. Combust. 108 (2022) 843-863,
    doi:10.1007/s10494-021-00291-w (points as digitised by others).

    Examples
    --------
    An invented ink; 1 % of the radius, of the speed, and of a pressure of about 2 bar:

    >>> from dropkit.models import jet
    >>> ink = ("1050 kg/m3", "4 mPa*s", "42 mN/m", "20 m/s", "60 um", "280 um")
    >>> print(f"{jet.stimulated_breakup_length(*ink, radius_amplitude='0.3 um').length:.2f}")
    8.39 millimeter
    >>> print(f"{jet.stimulated_breakup_length(*ink, velocity_amplitude='0.2 m/s').length:.2f}")
    4.58 millimeter
    >>> drive = {"pressure_amplitude": "2.1 kPa", "nozzle_length": "60 um"}
    >>> print(f"{jet.stimulated_breakup_length(*ink, **drive).length:.2f}")
    7.07 millimeter
    """
    given = (radius_amplitude, velocity_amplitude, pressure_amplitude)
    _check(given, nozzle_length, (nozzle_diameter, nozzle_length, kinetic_factor))
    radius = 0.5 * jet_diameter
    x: Any = math.pi * jet_diameter / wavelength
    with np.errstate(all="ignore"):
        damping, drive = damping_and_drive(
            density, viscosity, surface_tension, jet_diameter, wavelength
        )
        growing: Any = growth_rate
        if growing is None:
            growing = drive / (damping + (damping * damping + drive) ** 0.5)
        decaying = growing + 2.0 * damping
        speed: Any = velocity_amplitude
        if pressure_amplitude is not None:
            hole: Any = jet_diameter if nozzle_diameter is None else nozzle_diameter
            narrowing = (hole / jet_diameter) ** 2
            inside: Any = velocity_amplitude_from_pressure.si(
                density,
                viscosity,
                velocity / narrowing,
                hole,
                nozzle_length,
                velocity / wavelength,
                pressure_amplitude,
                kinetic_factor=1.0 if kinetic_factor is None else kinetic_factor,
            )
            speed = inside * narrowing
        ratio: Any
        if radius_amplitude is not None:
            ratio = radius_amplitude / radius
            time = np.where(ratio < 1.0, -np.log(ratio), np.nan) / growing
        else:
            ratio = math.pi * speed / (wavelength * (growing + decaying))
            time = _two_waves(ratio, decaying / growing) / growing
    mask = outside_mask("stimulated_breakup_length", outside, (x, GROWING), (ratio, LINEAR))
    results = (velocity * time, time, ratio * radius)
    # Without a length nothing is known of the rest either.
    unknown: Any = np.isnan(results[0]) | mask
    if not np.ndim(unknown):
        unknown = bool(unknown)
    return StimulatedBreakup(*(blank_outside(_plain(value), unknown) for value in results))


def _check(given: tuple[Any, ...], nozzle_length: Any, nozzle: tuple[Any, ...]) -> None:
    """Exactly one amplitude, and a nozzle with a pressure only."""
    count = sum(value is not None for value in given)
    if count != 1:
        raise BadInput(
            f"stimulated_breakup_length: {count or 'no'} amplitude{'s' * (count > 1)} given",
            allowed="exactly one of radius_amplitude, velocity_amplitude, pressure_amplitude",
        )
    if given[2] is not None and nozzle_length is None:
        raise BadInput(
            "stimulated_breakup_length: a pressure amplitude needs the length of the hole",
            allowed="nozzle_length above zero",
            hint="The liquid in a long hole follows a fast pressure less than in a short one",
        )
    if given[2] is None and any(value is not None for value in nozzle):
        raise BadInput(
            "stimulated_breakup_length: a nozzle is of use with a pressure amplitude only",
            allowed="nozzle_diameter, nozzle_length, kinetic_factor beside pressure_amplitude",
        )


def _two_waves(ratio: Any, decay: Any) -> Any:
    """T where ratio (exp(T) - exp(-decay T)) = 1."""
    level = 1.0 / ratio
    folds = np.maximum(np.log(level), 0.0)
    for _ in range(_STEPS):
        fading = np.exp(-decay * folds)
        sum_ = level + fading
        folds = folds - (folds - np.log(sum_)) / (1.0 + decay * fading / sum_)
    return folds


def _plain(value: Any) -> Any:
    """An array, or a float of Python."""
    return value if np.ndim(value) else float(value)
