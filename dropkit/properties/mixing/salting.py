"""What dissolved solids make of the solvent's value: the published forms, applied to a blend.

Salts of Laliberte's table add up as he does it, each at the mass fraction w of all of them:

    f(y) = (1 - w) f(y0) + sum_i w_i f_i(w),

with f the reciprocal for density and the logarithm for viscosity. Surface tensions are
multiplied: each solute changes that of water by its own factor. Where another form is among
several solutes no rule was published; then each solute does what it does to the solvent when
it is alone in it, which makes the result an estimate:

    1/rho = w_s/rho_0 + sum_i [(w_i + w_s)/rho_i - w_s/rho_0],
    ln eta = ln eta_0 + sum_i ln(eta_i/eta_0),

with y_i the value of solute i at its share w_i/(w_i + w_s) in the solvent s. Its error is how
far that lies from the same sums taken at the mass fractions w_i in the whole solution.
"""

from __future__ import annotations

from collections.abc import Sequence
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit import records
from dropkit.properties.mixing import electrolytes, solutions
from dropkit.properties.mixing.pair import share_of
from dropkit.records import PropertyRecord

if TYPE_CHECKING:
    from dropkit.properties.mixing.blends import Blend

__all__ = ["SOLUTE_FORMS", "limiting_share", "rules_apart", "salted", "untested"]

SOLUTE_FORMS: Final = {
    "density": ("laliberte_density", "solute_polynomial"),
    "viscosity": ("laliberte_viscosity", "solute_polynomial"),
    "surface_tension": ("dutcher_surface_tension", "solute_polynomial"),
    "refractive_index": ("solute_polynomial",),
}


def _forward(transform: str, value: Any) -> Any:
    if transform == "log":
        return np.log(value)
    return 1.0 / value if transform == "reciprocal" else value


def _backward(transform: str, value: Any) -> Any:
    if transform == "log":
        return np.exp(value)
    return 1.0 / value if transform == "reciprocal" else value


def untested(rule: Blend) -> bool:
    """Whether several solutes are added up by a rule that was not published with their forms."""
    return len(rule.salts) > 1 and any(b.form == "solute_polynomial" for b in rule.salts)


def salted(rule: Blend, solvent: Any, mass: Sequence[Any], temperature: Any) -> Any:
    """What the solutes make of the solvent's value; floats or arrays."""
    if rule.property == "surface_tension":
        return _tension(rule, solvent, mass, temperature)
    if untested(rule):
        return _each_alone(rule, solvent, mass, temperature, of_solvent=True)
    solute = sum(mass[i] for i in rule.solutes)
    base = _forward(rule.transform, solvent)
    if rule.salts[0].form == "solute_polynomial":
        total = _polynomial(
            rule, rule.solutes[0], rule.salts[0], solvent, solute, mass, temperature
        )
        return _backward(rule.transform, total)
    total = (1.0 - solute) * base
    for i, block in zip(rule.solutes, rule.salts, strict=True):
        total = total + mass[i] * _apparent(rule, block, solute, temperature)
    return _backward(rule.transform, total)


def _apparent(rule: Blend, block: PropertyRecord, solute: Any, temperature: Any) -> Any:
    """Laliberte's value of the salt itself, transformed."""
    # Where there is none it is weighted with zero, but some forms are infinite there.
    present = np.where(solute > 0.0, solute, 0.01) if np.ndim(solute) else (solute or 0.01)
    if rule.property == "density":
        value = electrolytes.apparent_density(block.parameters, present, temperature)
    else:
        value = electrolytes.apparent_viscosity(block.parameters, present, temperature)
    return _forward(rule.transform, value)


def _polynomial(
    rule: Blend,
    number: int,
    block: PropertyRecord,
    solvent: Any,
    solute: Any,
    mass: Sequence[Any],
    temperature: Any,
) -> Any:
    """A solution by the polynomial form at a mass fraction of one solute, transformed."""
    basis = block.parameters["basis"]
    moles: Any = 0.0
    if basis == "mole":
        kilograms = sum(mass[i] for i in rule.solvents)
        moles = sum(
            mass[i] / entry.molar_mass for i, entry in zip(rule.solvents, rule.records, strict=True)
        )
        moles = (1.0 - solute) * moles / kilograms
    molar_mass = records.liquid_record(rule.keys[number]).molar_mass
    x = solutions.solute_fraction(basis, solute, molar_mass, moles)
    return _forward(rule.transform, solutions.dissolved(block.parameters, solvent, x, temperature))


def _each_alone(
    rule: Blend, solvent: Any, mass: Sequence[Any], temperature: Any, *, of_solvent: bool
) -> Any:
    """Single effects added up, at shares in the solvent or at fractions of the whole."""
    base = _forward(rule.transform, solvent)
    liquid = 1.0 - sum(mass[i] for i in rule.solutes)
    total = liquid * base if rule.transform == "reciprocal" else base
    for i, block in zip(rule.solutes, rule.salts, strict=True):
        share = share_of(mass[i], liquid) if of_solvent else mass[i]
        if block.form == "solute_polynomial":
            alone = _polynomial(rule, i, block, solvent, share, mass, temperature)
        else:
            alone = (1.0 - share) * base + share * _apparent(rule, block, share, temperature)
        if rule.transform != "reciprocal":
            total = total + (alone - base)
        elif of_solvent:
            total = total + (mass[i] + liquid) * alone - liquid * base
        else:
            total = total + alone - (1.0 - share) * base
    return _backward(rule.transform, total)


def rules_apart(rule: Blend, mass: Sequence[Any], temperature: Any) -> float:
    """Largest relative difference between the two ways of adding up single effects."""
    shape = np.broadcast_shapes(np.shape(temperature), *(np.shape(w) for w in mass))
    kelvin = np.broadcast_to(temperature, shape).reshape(-1).astype(float)
    wide = [np.broadcast_to(w, shape).reshape(-1) for w in mass]
    if rule.property == "surface_tension":
        return 0.0  # factors of their own either way
    solvent = np.empty(kelvin.size)
    with np.errstate(all="ignore"):
        rule.curves[0].fill(kelvin, solvent)
        one, other = (
            _each_alone(rule, solvent, wide, kelvin, of_solvent=way) for way in (True, False)
        )
        apart = np.abs(np.log(one / other))
    return float(np.nanmax(apart)) if np.isfinite(apart).any() else 1.0


def limiting_share(rule: Blend, number: int, mass: Sequence[Any]) -> Any:
    """The share of a solute in water that its record's composition range limits."""
    alone = len(rule.solutes) > 1 and untested(rule)
    solute = mass[number] if alone else sum(mass[i] for i in rule.solutes)
    return share_of(solute, mass[rule.keys.index("water")])


def _tension(rule: Blend, solvent: Any, mass: Sequence[Any], temperature: Any) -> Any:
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
        if block.form == "solute_polynomial":
            x = mass[i] if block.parameters["basis"] == "mass" else moles[i] / total
            ratio = solutions.dissolved(block.parameters, pure, x, temperature) / pure
        else:
            ratio = electrolytes.surface_tension_ratio(
                block.parameters, moles[i] / total, pure, temperature
            )
        solvent = solvent * ratio
    return solvent
