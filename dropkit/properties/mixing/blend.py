"""One property of a set of components: which records enter, by what rule, how well known.

Solvents first: pure ends and fitted pairs. Salts then act on that solvent. A pair without
a record enters without excess, and the property is an estimate.
"""

from __future__ import annotations

import tomllib
from collections.abc import Callable, Sequence
from functools import cache
from itertools import combinations
from typing import Any, Final

import numpy as np

from dropkit import records
from dropkit.errors import EstimateRefused, MissingProperty
from dropkit.properties.composition import reference_density
from dropkit.properties.curves import Curve, FloatArray
from dropkit.properties.mixing import electrolytes
from dropkit.properties.mixing.redlich_kister import (
    RULES,
    PairExcess,
    collapse,
    reduced_temperature,
)
from dropkit.records import LiquidRecord, PropertyRecord
from dropkit.validity import Range

__all__ = ["Blend", "blend"]

_SALT_FORMS: Final = {
    "density": "laliberte_density",
    "viscosity": "laliberte_viscosity",
    "surface_tension": "dutcher_surface_tension",
}


@cache
def blend(prop: str, keys: tuple[str, ...]) -> Blend:
    """The `Blend` of a property for some components, made once."""
    return Blend(prop, keys)


@cache
def estimate_errors() -> dict[str, Any]:
    """Measured errors of estimates on pairs that were hidden from the rule."""
    path = records.data_dir() / "mixtures-estimates.toml"
    return tomllib.loads(path.read_text(encoding="utf-8"))


class Blend:
    """How one property of some components is put together.

    Parameters
    ----------
    prop : str
        A property with a mixing rule.
    keys : tuple of str
        Record keys of the components that are present.
    """

    def __init__(self, prop: str, keys: tuple[str, ...]) -> None:
        if prop not in RULES:
            raise MissingProperty(
                f"{prop} is not predicted for mixtures",
                allowed=", ".join(RULES) + ", kinematic_viscosity",
                hint=f"If you have measured it, add it: with_values({prop}=...)",
            )
        self.property = prop
        self.keys = keys
        self.transform, self.basis = RULES[prop]
        entries = [records.liquid_record(key) for key in keys]
        self.solvents = [i for i, entry in enumerate(entries) if entry.kind == "liquid"]
        self.solutes = [i for i, entry in enumerate(entries) if entry.kind != "liquid"]
        self.records = [entries[i] for i in self.solvents]
        if not self.solvents:
            raise MissingProperty(
                f"{entries[0].name} is a solid: a mixture needs a liquid to dissolve it in"
            )
        for entry in self.records:
            if prop not in entry.properties:
                raise MissingProperty(
                    f"{entry.name} has no {prop}, so a mixture with it has none",
                    allowed="components that have it",
                    hint=f"If you have measured it, add it: with_values({prop}=...)",
                )
        self.curves = [Curve(e.properties[prop], inside_mixtures=True) for e in self.records]
        self.inverse_density = [
            1.0 / reference_density(keys[i]) if self.basis == "volume" else 1.0
            for i in self.solvents
        ]
        self.pairs: list[tuple[int, int, PairExcess]] = []
        self.unfitted: list[tuple[int, int]] = []
        for i, j in combinations(range(len(self.solvents)), 2):
            self._read_pair(i, j)
        self.salts = [self._read_salt(entries[i]) for i in self.solutes]
        self.caps = self._read_caps()

    def _read_pair(self, i: int, j: int) -> None:
        a, b = self.records[i].key, self.records[j].key
        found = records.pair_record(a, b)
        blocks = found.properties.get(self.property, ()) if found else ()
        if not blocks or found is None:
            self.unfitted.append((i, j))
        elif found.components[0] == a:
            self.pairs.append((i, j, PairExcess(blocks[0])))
        else:
            self.pairs.append((j, i, PairExcess(blocks[0])))

    def _read_salt(self, salt: LiquidRecord) -> PropertyRecord:
        found = records.pair_record(salt.key, "water")
        blocks = found.properties.get(self.property, ()) if found else ()
        water = any(entry.key == "water" for entry in self.records)
        if not blocks or not water or blocks[0].form != _SALT_FORMS.get(self.property):
            where = "" if water else " in a solvent without water"
            raise MissingProperty(
                f"No record says what {salt.name} does to {self.property}{where}",
                hint=f"If you have measured it, add it: with_values({self.property}=...)",
            )
        return blocks[0]

    def _read_caps(self) -> list[tuple[int, int, PairExcess]]:
        """Aqueous pairs of amphiphiles: an estimate never exceeds the binary at the same ratio."""
        if self.property != "surface_tension":
            return []
        water = next((i for i, e in enumerate(self.records) if e.key == "water"), None)
        if water is None:
            return []
        caps = []
        for i, entry in enumerate(self.records):
            if not entry.amphiphile or i == water:
                continue
            fitted = [pair for pair in self.pairs if {pair[0], pair[1]} == {i, water}]
            if not fitted:
                raise EstimateRefused(
                    f"The surface tension of {entry.name} in water is not estimated: a little of "
                    "it gathers at the surface and lowers the value by a factor of up to three, "
                    "and no measured pair is in the records",
                    hint="Measure it and add it: with_values(surface_tension=...)",
                )
            caps.append(fitted[0])
        return caps if self.estimated else []

    # ------------------------------------------------ what is known of it
    @property
    def estimated(self) -> bool:
        """Whether any pair enters without a record."""
        return bool(self.unfitted) or (bool(self.solutes) and len(self.solvents) > 1)

    @property
    def range(self) -> Range:
        """Temperatures at which all that enters is within its range."""
        low = max(curve.range.low for curve in self.curves)
        high = min(curve.range.high for curve in self.curves)
        for block in self.blocks:
            low, high = max(low, block.range.low), min(high, block.range.high)
        if low > high:
            raise MissingProperty(
                f"{self.property}: the ranges of the components have no temperature in common"
            )
        return Range(low, high)

    @property
    def blocks(self) -> list[PropertyRecord]:
        """The records of pairs and salts."""
        return [pair.record for _, _, pair in self.pairs] + self.salts

    @property
    def estimate_error(self) -> float:
        """Relative standard uncertainty that an estimate adds; 0 without one."""
        if not self.estimated:
            return 0.0
        table = estimate_errors()[self.property]
        watery = any(
            "water" in (self.records[i].key, self.records[j].key) for i, j in self.unfitted
        )
        watery = watery or bool(self.solutes)
        return float(table["with_water" if watery else "without_water"]["uncertainty"])

    @property
    def method(self) -> str:
        """The rule in one line."""
        parts = []
        if len(self.solvents) > 1:
            how = {"log": "logarithm", "reciprocal": "reciprocal", "linear": "value"}
            parts.append(
                f"{how[self.transform]} by {self.basis} fraction with Redlich-Kister excess of "
                f"{len(self.pairs)} fitted of {len(self.pairs) + len(self.unfitted)} pairs"
            )
        parts += [f"{block.form} on the solvent" for block in self.salts]
        return "; ".join(parts)

    def limits(self) -> list[tuple[tuple[int, ...], tuple[int, ...], Range, PropertyRecord]]:
        """Composition limits: (numerator, denominator) component numbers, range, record."""
        found: list[tuple[tuple[int, ...], tuple[int, ...], Range, PropertyRecord]] = []
        for i, j, pair in self.pairs:
            a, b = self.solvents[i], self.solvents[j]
            found.append(((a,), (a, b), _fraction_range(pair.record, self.keys[a]), pair.record))
        for number, block in zip(self.solutes, self.salts, strict=True):
            everything = tuple(range(len(self.keys)))
            limits = _fraction_range(block, self.keys[number])
            found.append((tuple(self.solutes), everything, limits, block))
        return found

    # ------------------------------------------------ one composition
    def _fractions(self, mass: Sequence[Any]) -> list[Any]:
        """Solvents' fractions on the rule's basis, free of salts."""
        parts = [mass[i] * v for i, v in zip(self.solvents, self.inverse_density, strict=True)]
        total = sum(parts)
        return [part / total for part in parts]

    def scalar(self, mass: Sequence[float]) -> Callable[[float], float]:
        """The property [SI] as a function of temperature [K] for one composition."""
        fractions = self._fractions(mass)
        ends = [curve.scalar for curve in self.curves]
        if len(ends) == 1:
            value = ends[0]
        else:
            excess = [p.at_composition(fractions[i], fractions[j]) for i, j, p in self.pairs]
            value = collapse(self.transform, ends, fractions, excess)
        for i, j, pair in self.caps:
            total = fractions[i] + fractions[j]
            if total > 0.0:
                two = (fractions[i] / total, fractions[j] / total)
                cap = collapse(self.transform, (ends[i], ends[j]), two, [pair.at_composition(*two)])
                value = _lower(value, cap)
        return self._salted_scalar(value, mass) if self.salts else value

    def _salted_scalar(
        self, solvent: Callable[[float], float], mass: Sequence[float]
    ) -> Callable[[float], float]:
        def value(temperature: float) -> float:
            return float(self._salted(solvent(temperature), mass, temperature))

        return value

    def _salted(self, solvent: Any, mass: Sequence[Any], temperature: Any) -> Any:
        """What the salts make of the solvent's value; floats or arrays."""
        solute = sum(mass[i] for i in self.solutes)
        if self.property == "density":
            specific = (1.0 - solute) / solvent
            for i, block in zip(self.solutes, self.salts, strict=True):
                specific = specific + mass[i] / electrolytes.apparent_density(
                    block.parameters, solute, temperature
                )
            return 1.0 / specific
        if self.property == "viscosity":
            logarithm = (1.0 - solute) * np.log(solvent)
            for i, block in zip(self.solutes, self.salts, strict=True):
                salt = electrolytes.apparent_viscosity(block.parameters, solute, temperature)
                logarithm = logarithm + mass[i] * np.log(salt)
            return np.exp(logarithm)
        water = self.records.index(next(e for e in self.records if e.key == "water"))
        end = self.curves[water]
        pure: Any
        if isinstance(temperature, np.ndarray):
            pure = np.empty(temperature.shape)
            end.fill(temperature, pure)
        else:
            pure = end.scalar(temperature)
        moles = [mass[i] / records.liquid_record(key).molar_mass for i, key in enumerate(self.keys)]
        total = sum(moles)
        for i, block in zip(self.solutes, self.salts, strict=True):
            solvent = solvent * electrolytes.surface_tension_ratio(
                block.parameters, moles[i] / total, pure, temperature
            )
        return solvent

    # ------------------------------------------------ arrays
    def fill(self, mass: Sequence[Any], temperature: FloatArray, out: FloatArray) -> None:
        """Write the property [SI] into `out`; one flat chunk of compositions and temperatures."""
        ends = []
        for curve in self.curves:
            end = np.empty_like(out)
            curve.fill(temperature, end)
            ends.append(end)
        if len(ends) == 1:
            out[:] = ends[0]
        else:
            fractions = self._fractions(mass)
            reduced = reduced_temperature(temperature)
            shaped = [_forward(self.transform, end) for end in ends]
            binary = len(ends) == 2
            _combine(self.transform, shaped, fractions, self.pairs, reduced, out, binary=binary)
            for i, j, pair in self.caps:
                total = fractions[i] + fractions[j]
                present = np.asarray(total) > 0.0
                share = np.ones(present.shape)
                np.divide(fractions[i], total, out=share, where=present)
                cap = np.empty_like(out)
                two = [share, 1.0 - share]
                _combine(
                    self.transform,
                    [shaped[i], shaped[j]],
                    two,
                    [(0, 1, pair)],
                    reduced,
                    cap,
                    binary=True,
                )
                np.minimum(out, cap, out=out, where=present)
        if self.salts:
            out[:] = self._salted(out, mass, temperature)


def _combine(
    transform: str,
    shaped: Sequence[FloatArray],
    fractions: Sequence[Any],
    pairs: Sequence[tuple[int, int, PairExcess]],
    reduced: FloatArray,
    out: FloatArray,
    *,
    binary: bool,
) -> None:
    np.multiply(fractions[0], shaped[0], out=out)
    for x, y in zip(fractions[1:], shaped[1:], strict=True):
        out += x * y
    for i, j, pair in pairs:
        pair.add(fractions[i], fractions[j], reduced, out, binary=binary)
    if transform == "log":
        np.exp(out, out=out)
    elif transform == "reciprocal":
        np.reciprocal(out, out=out)


def _forward(transform: str, value: FloatArray) -> FloatArray:
    if transform == "log":
        return np.log(value, out=value)
    if transform == "reciprocal":
        return np.reciprocal(value, out=value)
    return value


def _lower(
    first: Callable[[float], float], second: Callable[[float], float]
) -> Callable[[float], float]:
    return lambda temperature: min(first(temperature), second(temperature))


def _fraction_range(block: PropertyRecord, key: str) -> Range:
    low, high = block.parameters.get("fraction_range", (0.0, 1.0))
    return Range(float(low), float(high), f"mass fraction of {key}", "")
