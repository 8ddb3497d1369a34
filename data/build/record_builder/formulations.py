"""Sampling reference formulations: the saturated liquid of CoolProp, and two IAPWS releases."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from typing import Any

import numpy as np

from record_builder import BuildError
from record_builder.forms import Array
from record_builder.points import Point

__all__ = ["SAMPLE", "refractive_index_of_water", "sample"]

# The file name that marks a sampled point.
SAMPLE = "formulation"

_COOLPROP = {
    "density": "D",
    "viscosity": "V",
    "vapour_pressure": "P",
    "heat_capacity": "C",
    "thermal_conductivity": "L",
    "speed_of_sound": "A",
    "surface_tension": "I",
}


def _coolprop(prop: str, fluid: str, T: Array) -> Array:
    from CoolProp.CoolProp import PropsSI

    if prop == "surface_tension" and fluid == "Water":
        raise BuildError("CoolProp's surface tension of water is not that of IAPWS")

    def liquid(output: str, quality: float) -> Array:
        return np.array([PropsSI(output, "T", t, "Q", quality, fluid) for t in T])

    if prop == "heat_of_vaporisation":
        return np.asarray(liquid("H", 1.0) - liquid("H", 0.0))
    if prop not in _COOLPROP:
        raise BuildError(f"CoolProp gives no {prop}")
    return liquid(_COOLPROP[prop], 0.0)


def refractive_index_of_water(density: Array, T: Array, wavelength: float) -> Array:
    """IAPWS R9-97, density in kg/m3, wavelength in micrometres, relative to vacuum."""
    rho, theta, square = density / 1000.0, T / 273.15, (wavelength / 0.589) ** 2
    molar = (
        0.244257733
        + 9.74634476e-3 * rho
        - 3.73234996e-3 * theta
        + 2.68678472e-4 * square * theta
        + 1.58920570e-3 / square
        + 2.45934259e-3 / (square - 0.2292020**2)
        + 0.900704920 / (square - 5.432937**2)
        - 1.66626219e-2 * rho**2
    ) * rho
    return np.asarray(np.sqrt((1.0 + 2.0 * molar) / (1.0 - molar)))


def _iapws_r9(prop: str, fluid: str, T: Array) -> Array:
    if (prop, fluid) != ("refractive_index", "Water"):
        raise BuildError("IAPWS R9-97 is the refractive index of water")
    density = _coolprop("density", "Water", T)
    return refractive_index_of_water(density, T, 0.5893) / _AIR


# Index of air at 589 nm and room conditions (from memory): refractometers read against air.
_AIR = 1.00027

_ENGINES: dict[str, Callable[[str, str, Array], Array]] = {
    "CoolProp": _coolprop,
    "IAPWS R9-97": _iapws_r9,
}


def sample(prop: str, wanted: Mapping[str, Any]) -> list[Point]:
    """Points of a formulation at Chebyshev nodes, dense at the ends where a fit needs them."""
    low, high = wanted["T"]
    count = int(wanted.get("points", 61))
    nodes = np.cos(np.pi * np.arange(count) / (count - 1))
    T = 0.5 * (low + high) - 0.5 * (high - low) * nodes
    T = np.clip(T, low, high)
    engine = _ENGINES.get(wanted["engine"])
    if engine is None:
        raise BuildError(f"engine {wanted['engine']!r}; known: {', '.join(_ENGINES)}")
    values = engine(prop, wanted["fluid"], T)
    if not np.all(np.isfinite(values)):
        raise BuildError(f"{wanted['engine']} gives no {prop} somewhere in {low} to {high} K")
    weight = float(wanted.get("weight", 1.0))
    return [
        Point(SAMPLE, "", float(t), float("nan"), float(y), weight)
        for t, y in zip(T, values, strict=True)
    ]
