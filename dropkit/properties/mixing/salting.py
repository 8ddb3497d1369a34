"""What dissolved salts make of the solvent's value: the published forms, applied to a blend."""

from __future__ import annotations

from collections.abc import Sequence
from typing import TYPE_CHECKING, Any

import numpy as np

from dropkit import records
from dropkit.properties.mixing import electrolytes

if TYPE_CHECKING:
    from dropkit.properties.mixing.blends import Blend

__all__ = ["salted"]


def salted(rule: Blend, solvent: Any, mass: Sequence[Any], temperature: Any) -> Any:
    """What the salts make of the solvent's value; floats or arrays."""
    solute = sum(mass[i] for i in rule.solutes)
    if rule.property == "density":
        specific = (1.0 - solute) / solvent
        for i, block in zip(rule.solutes, rule.salts, strict=True):
            specific = specific + mass[i] / electrolytes.apparent_density(
                block.parameters, solute, temperature
            )
        return 1.0 / specific
    if rule.property == "viscosity":
        logarithm = (1.0 - solute) * np.log(solvent)
        for i, block in zip(rule.solutes, rule.salts, strict=True):
            salt = electrolytes.apparent_viscosity(block.parameters, solute, temperature)
            logarithm = logarithm + mass[i] * np.log(salt)
        return np.exp(logarithm)
    water = rule.records.index(next(e for e in rule.records if e.key == "water"))
    end = rule.curves[water]
    pure: Any
    if isinstance(temperature, np.ndarray):
        pure = np.empty(temperature.shape)
        end.fill(temperature, pure)
    else:
        pure = end.scalar(temperature)
    moles = [mass[i] / records.liquid_record(key).molar_mass for i, key in enumerate(rule.keys)]
    total = sum(moles)
    for i, block in zip(rule.solutes, rule.salts, strict=True):
        solvent = solvent * electrolytes.surface_tension_ratio(
            block.parameters, moles[i] / total, pure, temperature
        )
    return solvent
