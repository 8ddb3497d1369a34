"""Every quantity of solved streams, with its kind and what it means."""

from __future__ import annotations

import math
from collections.abc import Mapping
from dataclasses import dataclass
from typing import Any, Final

import numpy as np

from dropkit.design.stream_hole import Hole
from dropkit.design.stream_solver import Liquid, Solved
from dropkit.models import jet, nozzle

__all__ = ["QUANTITIES", "Drive", "quantities"]

# Quantity -> kind and meaning, in the order of tables.
QUANTITIES: Final[dict[str, tuple[str, str]]] = {
    "drop_diameter": ("length", "diameter of a drop"),
    "drop_volume": ("volume", "volume of a drop"),
    "drop_mass": ("mass", "mass of a drop"),
    "frequency": ("frequency", "drops per second from one hole, the drive's frequency"),
    "drop_rate": ("frequency", "drops per second from all holes"),
    "flow": ("flow", "volume flow of one hole"),
    "total_flow": ("flow", "volume flow of all holes"),
    "mass_flow": ("mass_flow", "mass flow of all holes"),
    "velocity": ("velocity", "speed of the jet"),
    "jet_diameter": ("length", "diameter of the jet"),
    "wavelength": ("length", "length of the wave on the jet, the pitch of the drops"),
    "wavelength_ratio": ("ratio", "wavelength over jet diameter"),
    "drop_ratio": ("ratio", "drop diameter over jet diameter"),
    "nozzle_diameter": ("length", "diameter of the hole"),
    "nozzle_length": ("length", "length of the hole"),
    "contraction": ("ratio", "jet diameter over hole diameter"),
    "gauge_pressure": ("gauge_pressure", "pressure ahead of the hole, above the surroundings"),
    "pressure_kinetic": ("pressure", "of it, what moves the liquid"),
    "pressure_entry": ("pressure", "of it, what is lost at the entry"),
    "pressure_viscous": ("pressure", "of it, what friction takes"),
    "pressure_capillary": ("pressure", "of it, what surface tension holds in the jet"),
    "growth_rate": ("growth_rate", "growth rate of the driven wave"),
    "breakup_length": ("distance", "distance from the hole to the first drop"),
    "breakup_length_low": ("distance", "low end of its 95 % band"),
    "breakup_length_high": ("distance", "high end of its 95 % band"),
    "breakup_time": ("time", "time from the hole to the first drop"),
    "radius_amplitude": ("length", "amplitude of the radius at the hole that the drive makes"),
    "weber": ("ratio", "Weber number of the jet, on its diameter"),
    "ohnesorge": ("ratio", "Ohnesorge number of the jet, on its diameter"),
    "reynolds": ("ratio", "Reynolds number of the hole, on its diameter"),
    "gas_weber": ("ratio", "Weber number with the gas's density, on the jet's diameter"),
    "shear_rate": ("shear_rate", "shear rate at the wall of the hole, parabolic profile"),
}


@dataclass(frozen=True, slots=True)
class Drive:
    """Amplitude of the drive, at most one of three, middle to peak; arrays [SI].

    Parameters
    ----------
    word : str
        ``"radius_amplitude"``, ``"velocity_amplitude"``, ``"pressure_amplitude"``, or empty for a
        jet whose drive is unknown.
    value : float or array
        The amplitude.
    """

    word: str = ""
    value: Any = math.nan


def quantities(
    liquid: Liquid, solved: Solved, hole: Hole, holes: Any, gas_density: Any, drive: Drive
) -> dict[str, Any]:
    """All quantities of solved streams [SI], NaN where undetermined.

    Parameters
    ----------
    liquid : Liquid
        Density, viscosity, surface tension.
    solved : Solved
        From `solve`.
    hole : Hole
        Kind and length of the hole.
    holes : float or array
        How many there are.
    gas_density : float or array
        Of the surroundings [kg/m3].
    drive : Drive
        Amplitude of the drive.

    Returns
    -------
    dict of str to ndarray
        The words of `QUANTITIES`.
    """
    with np.errstate(all="ignore"):
        d, speed, ratio = np.exp(solved.size), np.exp(solved.speed), np.exp(solved.ratio)
        bore = solved.nozzle_diameter
        flow = 0.25 * math.pi * d * d * speed
        volume = 0.25 * math.pi * d**3 * ratio
        frequency = speed / (d * ratio)
        wavelength = d * ratio
        rho, mu, gamma = liquid.density, liquid.viscosity, liquid.surface_tension
        parts = hole.pressure(rho, mu, gamma, flow, bore)
        inside = 4.0 * flow / (math.pi * bore * bore)
        found = {
            "drop_diameter": np.cbrt(6.0 / math.pi * volume),
            "drop_volume": volume,
            "drop_mass": rho * volume,
            "frequency": frequency,
            "drop_rate": holes * frequency,
            "flow": flow,
            "total_flow": holes * flow,
            "mass_flow": rho * holes * flow,
            "velocity": speed,
            "jet_diameter": d,
            "wavelength": wavelength,
            "wavelength_ratio": ratio,
            "drop_ratio": np.cbrt(1.5 * ratio),
            "nozzle_diameter": bore,
            "nozzle_length": hole.length_of(bore),
            "contraction": d / bore,
            "gauge_pressure": parts.total,
            "pressure_kinetic": parts.kinetic,
            "pressure_entry": parts.entry,
            "pressure_viscous": parts.viscous,
            "pressure_capillary": parts.capillary,
            **_breakup(liquid, hole, speed, d, bore, wavelength, drive),
            "weber": rho * speed * speed * d / gamma,
            "ohnesorge": mu / np.sqrt(rho * gamma * d),
            "reynolds": rho * inside * bore / mu,
            "gas_weber": gas_density * speed * speed * d / gamma,
            "shear_rate": nozzle.wall_shear_rate.si(inside, bore),
        }
    shape = np.shape(d)
    return {word: np.broadcast_to(found[word], shape) for word in QUANTITIES}


def _breakup(
    liquid: Liquid, hole: Hole, speed: Any, d: Any, bore: Any, wavelength: Any, drive: Drive
) -> Mapping[str, Any]:
    """Growth and breakup: driven where an amplitude is known, else the natural one with its band."""
    three = (liquid.density, liquid.viscosity, liquid.surface_tension)
    growth = jet.growth_rate_viscous_full.si(*three, d, wavelength, outside="nan")
    if not drive.word:
        found = jet.natural_breakup_length.si(*three, speed, d, outside="allow")
        return {
            "growth_rate": growth,
            "breakup_length": found.length,
            "breakup_length_low": found.low,
            "breakup_length_high": found.high,
            "breakup_time": found.length / speed,
            "radius_amplitude": np.full_like(d, np.nan),
        }
    options: dict[str, Any] = {drive.word: drive.value}
    if drive.word == "pressure_amplitude":
        options.update(nozzle_diameter=bore, nozzle_length=hole.length_of(bore))
    found = jet.stimulated_breakup_length.si(
        *three, speed, d, wavelength, **options, growth_rate=growth, outside="allow"
    )
    return {
        "growth_rate": growth,
        "breakup_length": found.length,
        "breakup_length_low": np.full_like(d, np.nan),
        "breakup_length_high": np.full_like(d, np.nan),
        "breakup_time": found.time,
        "radius_amplitude": found.radius_amplitude,
    }
