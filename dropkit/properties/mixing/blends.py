"""One property of a set of components: which records enter, by what rule, how well known.

Solvents first: pure ends and fitted pairs. Salts then act on that solvent. A pair without
a record enters without excess, and the property is an estimate.
"""

from __future__ import annotations

from collections.abc import Callable, Sequence
from functools import cache
from itertools import combinations, pairwise
from typing import Any

import numpy as np

from dropkit import records
from dropkit.errors import CompositionError, EstimateRefused, MissingProperty
from dropkit.properties.composition import reference_density
from dropkit.properties.curves import Curve, FloatArray, stepwise
from dropkit.properties.mixing.estimates import estimate_error, share_factor
from dropkit.properties.mixing.pair import Pair, share_of
from dropkit.properties.mixing.redlich_kister import RULES, collapse, reduced_temperature
from dropkit.properties.mixing.salting import (
    SOLUTE_FORMS,
    limiting_share,
    rules_apart,
    salted,
    untested,
)
from dropkit.provenance import GRADES
from dropkit.records import LiquidRecord, PropertyRecord
from dropkit.validity import Range

__all__ = ["Blend", "blend"]


@cache
def blend(prop: str, keys: tuple[str, ...]) -> Blend:
    """The `Blend` of a property for some components, made once."""
    return Blend(prop, keys)


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
                f"{entries[0].name} is a solute: a mixture needs a liquid to dissolve it in"
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
            1.0 / _reference_density(keys[i]) if self.basis == "volume" else 1.0
            for i in self.solvents
        ]
        self.pairs: list[Pair] = []
        self.unfitted: list[tuple[int, int]] = []
        for i, j in combinations(range(len(self.solvents)), 2):
            self._read_pair(i, j)
        self.salts = [self._read_salt(entries[i]) for i in self.solutes]
        self.caps = self._read_caps()
        if prop == "refractive_index" and self.estimated:
            raise EstimateRefused(
                "The refractive index of a pair without a record is not estimated: contraction "
                "shifts it by more than a refractometer's use allows",
                hint="Measure it and add it: with_values(refractive_index=...)",
            )

    def _read_pair(self, i: int, j: int) -> None:
        a, b = self.records[i].key, self.records[j].key
        found = records.pair_record(a, b)
        blocks = found.properties.get(self.property, ()) if found else ()
        if not blocks or found is None:
            self.unfitted.append((i, j))
        elif found.components[0] == a:
            self.pairs.append(Pair(i, j, blocks))
        else:
            self.pairs.append(Pair(j, i, blocks))

    def _read_salt(self, salt: LiquidRecord) -> PropertyRecord:
        found = records.pair_record(salt.key, "water")
        blocks = found.properties.get(self.property, ()) if found else ()
        water = any(entry.key == "water" for entry in self.records)
        if not blocks or not water or blocks[0].form not in SOLUTE_FORMS.get(self.property, ()):
            where = "" if water else " in a solvent without water"
            raise MissingProperty(
                f"No record says what {salt.name} does to {self.property}{where}",
                hint=f"If you have measured it, add it: with_values({self.property}=...)",
            )
        return blocks[0]

    def _read_caps(self) -> list[Pair]:
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
            fitted = [pair for pair in self.pairs if {pair.first, pair.second} == {i, water}]
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
        """Whether any pair enters without a record, or several solutes by an untested rule."""
        mixed = bool(self.solutes) and len(self.solvents) > 1
        return bool(self.unfitted) or mixed or untested(self)

    def range(self, mass: Sequence[Any]) -> Range:
        """Temperatures that all that enters can serve, at one composition or an array of them."""
        found = [curve.range for curve in self.curves]
        found += [block.range for block in self.salts]
        for pair in self.pairs:
            share = self._share(pair, mass)
            found.append(pair.range(None if isinstance(share, np.ndarray) else share))
        low, high = max(limits.low for limits in found), min(limits.high for limits in found)
        if low > high:
            raise MissingProperty(
                f"{self.property}: the ranges of the components have no temperature in common"
            )
        return Range(low, high)

    def _share(self, pair: Pair, mass: Sequence[Any]) -> Any:
        """Mass share of a pair's first component in the two."""
        return share_of(mass[self.solvents[pair.first]], mass[self.solvents[pair.second]])

    def without_gaps(self, mass: Sequence[float]) -> bool:
        """Whether one composition is served at all temperatures between the ends."""
        return all(pair.without_gaps(self._share(pair, mass)) for pair in self.pairs)

    def composition_limits(self, mass: Sequence[Any]) -> list[tuple[Any, Range]]:
        """Shares of the pairs and of the salts, with the ranges that they must keep."""
        found = []
        for pair in self.pairs:
            a, b = self.records[pair.first].name, self.records[pair.second].name
            limits = pair.share_range(f"mass fraction of {a} in {a} + {b}")
            if limits.low > 0.0 or limits.high < 1.0:
                found.append((self._share(pair, mass), limits))
        for number, block in zip(self.solutes, self.salts, strict=True):
            low, high = block.parameters.get("fraction_range", (0.0, 1.0))
            salt = self.keys[number].replace("_", " ")
            name = f"mass fraction of {salt} in {salt} + water"
            if self.keys[number] > "water":  # the record counts its first component
                low, high = round(1.0 - high, 9), round(1.0 - low, 9)
            limits = Range(float(low), float(high), name, "")
            found.append((limiting_share(self, number, mass), limits))
        return found

    def unserved(self, mass: Sequence[Any], temperature: Any) -> Any:
        """Mask of the points that lie in no record of some pair, though in its outer ranges."""
        kelvin = np.asarray(temperature, dtype=float)
        mask: Any = False
        for pair in self.pairs:
            if pair.whole is None or not pair.whole.covers(kelvin):
                mask = mask | (pair.serve(self._share(pair, mass), kelvin) < 0)
        return mask & ~np.isnan(kelvin) if np.any(mask) else False

    def serving(self, mass: Sequence[Any], temperature: Any) -> list[PropertyRecord]:
        """The records that serve some temperatures (all of them for None) at a composition."""
        kelvin = None if temperature is None else np.atleast_1d(np.asarray(temperature, float))
        used: list[PropertyRecord] = []
        for curve in self.curves:
            served = None if kelvin is None else np.unique(curve.serve(kelvin))
            used += [b for k, b in enumerate(curve.records) if served is None or k in served]
        for pair in self.pairs:
            share = self._share(pair, mass)
            if kelvin is not None:
                held = [k for k in np.unique(pair.serve(share, kelvin)) if k >= 0]
            elif isinstance(share, np.ndarray):
                held = []
            else:
                held = pair.holding(share)
            used += [pair.blocks[k] for k in held] or list(pair.blocks)
        return used + self.salts

    def cells(self) -> list[tuple[str, PropertyRecord, float, float]]:
        """Records of the pairs with the composition range of each: name of the first, record, ends."""
        return [
            (self.records[pair.first].name, block, low, high)
            for pair in self.pairs
            for block, (low, high) in zip(pair.blocks, pair.shares, strict=True)
        ]

    def grade_codes(self, mass: Sequence[Any], temperature: FloatArray) -> Any:
        """Place in `GRADES` of the worst grade at each point of an array."""
        codes = np.zeros(temperature.shape, dtype=int)
        if self.estimated:
            codes[:] = GRADES.index("estimated")
            return codes
        for curve in self.curves:
            grades = np.array([GRADES.index(block.grade) for block in curve.records])
            codes = np.maximum(codes, grades[curve.serve(temperature)])
        for pair in self.pairs:
            grades = np.array([GRADES.index(block.grade) for block in pair.blocks])
            number = pair.serve(self._share(pair, mass), temperature)
            codes = np.maximum(codes, grades[np.maximum(number, 0)])
        for block in self.salts:
            codes = np.maximum(codes, GRADES.index(block.grade))
        return codes

    def estimate_error(self, mass: Sequence[Any], temperature: Any = None) -> float:
        """Relative standard uncertainty that an estimate adds at its worst point; 0 without one.

        That of hidden pairs, by the share of the two; for salts in a mixed solvent, of which
        no hidden pair is known, the whole of their effect.
        """
        shares = self.fractions(mass)
        found = [0.0]
        for i, j in self.unfitted:
            watery = "water" in (self.records[i].key, self.records[j].key)
            share = float(np.max(share_factor(shares[i], shares[j])))
            found.append(share * estimate_error(self.property, with_water=watery))
        if self.solutes and len(self.solvents) > 1:
            found.append(self._salt_effect(mass, temperature))
        elif untested(self):
            limits = self.range(mass)
            middle = 0.5 * (limits.low + limits.high) if temperature is None else temperature
            found.append(rules_apart(self, mass, middle))
        return max(found)

    def _salt_effect(self, mass: Sequence[Any], temperature: Any) -> float:
        """Largest change, as a logarithm, that the salts make to the solvent's value."""
        limits = self.range(mass)
        kelvin = 0.5 * (limits.low + limits.high) if temperature is None else temperature
        shape = np.broadcast_shapes(np.shape(kelvin), *(np.shape(w) for w in mass))
        flat = np.broadcast_to(kelvin, shape).reshape(-1).astype(float)
        wide = [np.broadcast_to(w, shape).reshape(-1) for w in mass]
        bare = blend(self.property, tuple(self.keys[i] for i in self.solvents))
        with_salts, without = np.empty(flat.size), np.empty(flat.size)
        with np.errstate(all="ignore"):
            self.fill(wide, flat, with_salts)
            total = sum(wide[i] for i in self.solvents)
            bare.fill([wide[i] / total for i in self.solvents], flat, without)
            change = np.abs(np.log(with_salts / without))
        return float(np.nanmax(change)) if np.isfinite(change).any() else 1.0

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

    # ------------------------------------------------ one composition
    def fractions(self, mass: Sequence[Any]) -> list[Any]:
        """Solvents' fractions on the rule's basis, free of salts."""
        if self.basis == "mass" and not self.solutes:
            return list(mass)
        parts = [mass[i] * v for i, v in zip(self.solvents, self.inverse_density, strict=True)]
        total = parts[0]
        for part in parts[1:]:
            total = total + part
        shares = [part / total for part in parts[:-1]]
        last = 1.0 - shares[0] if len(parts) == 2 else parts[-1] / total
        return [*shares, last] if shares else [last]

    def scalar(self, mass: Sequence[float]) -> Callable[[float], float]:
        """The property [SI] as a function of temperature [K] for one composition."""
        fractions = self.fractions(mass)
        ends = [curve.scalar for curve in self.curves]
        shares = [self._share(pair, mass) for pair in self.pairs]
        held = [pair.holding(x) or [0] for pair, x in zip(self.pairs, shares, strict=True)]
        if all(len(numbers) == 1 for numbers in held):
            return self._fixed(mass, fractions, ends, [numbers[0] for numbers in held])
        return self._piecewise(mass, fractions, ends, shares, held)

    def _fixed(
        self,
        mass: Sequence[float],
        fractions: Sequence[float],
        ends: Sequence[Callable[[float], float]],
        numbers: Sequence[int],
    ) -> Callable[[float], float]:
        """The value at one composition, with one record chosen for each pair."""
        if len(ends) == 1:
            return self._salted_scalar(ends[0], mass) if self.salts else ends[0]
        chosen = [(pair, pair.excesses[k]) for pair, k in zip(self.pairs, numbers, strict=True)]
        excess = [
            entry.at_composition(fractions[pair.first], fractions[pair.second])
            for pair, entry in chosen
        ]
        value = collapse(self.transform, ends, fractions, excess)
        if self.salts:
            value = self._salted_scalar(value, mass)
        for pair, entry in chosen:
            if pair in self.caps:
                share = share_of(fractions[pair.first], fractions[pair.second])
                two = (share, 1.0 - share)
                parts = (ends[pair.first], ends[pair.second])
                cap = collapse(self.transform, parts, two, [entry.at_composition(*two)])
                value = _lower(value, cap)
        return value

    def _piecewise(
        self,
        mass: Sequence[float],
        fractions: Sequence[float],
        ends: Sequence[Callable[[float], float]],
        shares: Sequence[float],
        held: Sequence[Sequence[int]],
    ) -> Callable[[float], float]:
        """The same where several records share the temperatures of some pair."""
        limits = [
            pair.blocks[k].range
            for pair, numbers in zip(self.pairs, held, strict=True)
            for k in numbers
        ]
        edges = sorted({end for found in limits for end in (found.low, found.high)})
        middles = [0.5 * (a + b) for a, b in pairwise(edges)]
        made: dict[tuple[int, ...], Callable[[float], float]] = {}

        def serving(temperature: float) -> Callable[[float], float]:
            numbers = tuple(
                pair.serving(share, temperature)
                for pair, share in zip(self.pairs, shares, strict=True)
            )
            if numbers not in made:
                made[numbers] = self._fixed(mass, fractions, ends, numbers)
            return made[numbers]

        between = [serving(t) for t in (edges[0] - 1.0, *middles, edges[-1] + 1.0)]
        return stepwise(edges, between, [serving(end) for end in edges])

    def _salted_scalar(
        self, solvent: Callable[[float], float], mass: Sequence[float]
    ) -> Callable[[float], float]:
        def value(temperature: float) -> float:
            with np.errstate(all="ignore"):
                return float(salted(self, solvent(temperature), mass, temperature))

        return value

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
            fractions = self.fractions(mass)
            reduced = reduced_temperature(temperature)
            shaped = [_forward(self.transform, end) for end in ends]
            self._sum(fractions, shaped, self.pairs, mass, temperature, reduced, out)
        if self.salts:
            out[:] = salted(self, out, mass, temperature)
        for pair in self.caps:
            i, j = pair.first, pair.second
            share = share_of(fractions[i], fractions[j])
            two: list[Any] = [0.0] * len(ends)
            two[i], two[j] = share, 1.0 - share
            cap = np.empty_like(out)
            self._sum(two, shaped, [pair], mass, temperature, reduced, cap)
            present = np.asarray(fractions[i] + fractions[j]) > 0.0
            np.minimum(out, cap, out=out, where=present)

    def _sum(
        self,
        fractions: Sequence[Any],
        shaped: Sequence[FloatArray],
        pairs: Sequence[Pair],
        mass: Sequence[Any],
        temperature: FloatArray,
        reduced: FloatArray,
        out: FloatArray,
    ) -> None:
        """Ideal part and excesses into `out`, on the rule's scale and back."""
        np.multiply(fractions[0], shaped[0], out=out)
        for x, y in zip(fractions[1:], shaped[1:], strict=True):
            out += x * y
        binary = len(fractions) == 2
        for pair in pairs:
            two = (fractions[pair.first], fractions[pair.second])
            masses = (mass[self.solvents[pair.first]], mass[self.solvents[pair.second]])
            pair.add(two, masses, temperature, reduced, out, binary=binary)
        if self.transform == "log":
            np.exp(out, out=out)
        elif self.transform == "reciprocal":
            np.reciprocal(out, out=out)


def _reference_density(key: str) -> float:
    try:
        return reference_density(key)
    except CompositionError as problem:
        raise MissingProperty(f"Volume fractions need it: {problem.what}") from problem


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
