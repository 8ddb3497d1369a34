"""Published forms of a salt acting on its solvent, on the points of a pair."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from typing import Any

import numpy as np

from dropkit.properties.mixing import electrolytes
from record_builder.forms import Array

__all__ = ["SOLUTE_FORMS"]


def _density(
    p: Mapping[str, Any], T: Array, w: Array, solvent: Array, masses: tuple[float, float]
) -> Array:
    salt = electrolytes.apparent_density(p, w, T)
    return np.asarray(1.0 / ((1.0 - w) / solvent + w / salt))


def _viscosity(
    p: Mapping[str, Any], T: Array, w: Array, solvent: Array, masses: tuple[float, float]
) -> Array:
    salt = electrolytes.apparent_viscosity(p, w, T)
    return np.asarray(np.exp((1.0 - w) * np.log(solvent) + w * np.log(salt)))


def _surface_tension(
    p: Mapping[str, Any], T: Array, w: Array, solvent: Array, masses: tuple[float, float]
) -> Array:
    salt, rest = w / masses[0], (1.0 - w) / masses[1]
    ratio = electrolytes.surface_tension_ratio(p, salt / (salt + rest), solvent, T)
    return np.asarray(solvent * ratio)


SOLUTE_FORMS: dict[
    str, Callable[[Mapping[str, Any], Array, Array, Array, tuple[float, float]], Array]
] = {
    "laliberte_density": _density,
    "laliberte_viscosity": _viscosity,
    "dutcher_surface_tension": _surface_tension,
}
