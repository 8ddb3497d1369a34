"""How far a second source may disagree before a fit is refused."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any

import numpy as np

from record_builder import BuildError
from record_builder.forms import Array
from record_builder.subjects import Subject

__all__ = ["allowed"]

# The three main properties are set by the project's rules; the rest is the builder's choice.
_SECONDARY = {
    "vapour_pressure": 0.05,
    "heat_of_vaporisation": 0.03,
    "heat_capacity": 0.03,
    "thermal_conductivity": 0.05,
    "static_permittivity": 0.03,
    "speed_of_sound": 0.01,
    "diffusivity_in_air": 0.15,
    "refractive_index": 0.001,
    "electrical_conductivity": 9.0,
    # What traces of impurity do: the same pair in two laboratories.
    "interfacial_tension": 0.05,
}
_SMALL_STEP = 0.05  # K, for slopes


def allowed(
    subject: Subject,
    prop: str,
    block: Mapping[str, Any],
    form: str,
    parameters: Mapping[str, Any],
    T: Array,
    w: Array,
) -> tuple[Array, str]:
    """Largest relative deviation at each point, and the rule in words."""
    limit_class = block.get("limit_class", "")
    if limit_class not in ("", "technical", "melt"):
        raise BuildError(f"limit_class = {limit_class!r}; allowed: technical, melt")
    if prop == "density":
        limit = 0.015 if subject.metal else 0.01 if limit_class else 0.0015
        return np.full_like(T, limit), f"density {100 * limit:g} %"
    if prop == "surface_tension":
        limit = 0.05 if subject.metal else 0.02
        if subject.metal:
            texts = [*subject.data.get("cautions", []), *block.get("cautions", [])]
            if not any("oxide" in text for text in texts):
                raise BuildError(f"{subject.name}: surface tension of a metal needs its caution")
        return np.full_like(T, limit), f"surface tension {100 * limit:g} %"
    if prop == "viscosity":
        if subject.metal:
            limit = 2.0 * float(block["source_uncertainty"])
            return np.full_like(T, limit), f"stated uncertainty of a metal {100 * limit:.3g} %"
        warm = subject.values(prop, form, parameters, T + _SMALL_STEP, w)
        cold = subject.values(prop, form, parameters, T - _SMALL_STEP, w)
        half_kelvin = 0.5 * np.abs(np.log(warm / cold)) / (2.0 * _SMALL_STEP)
        # At the very end of a range only one side can be computed; 3 % holds there.
        half_kelvin = np.nan_to_num(half_kelvin)
        water = subject.water_slope(prop, form, parameters, T, w)
        water = water + float(block.get("viscosity_change_by_water", 0.0))
        limits = np.maximum(0.03, half_kelvin + water)
        return limits, "viscosity 3 %, or what 0.5 K and 0.2 % of water do"
    if prop not in _SECONDARY:
        raise BuildError(f"{subject.name}: no limit is known for property {prop!r}")
    limit = _SECONDARY[prop]
    return np.full_like(T, limit), f"{prop} {100 * limit:g} %"
