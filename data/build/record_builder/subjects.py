"""What a record is about, a liquid or a pair: how it is fitted and evaluated."""

from __future__ import annotations

import tomllib
from abc import ABC, abstractmethod
from collections.abc import Mapping, Sequence
from dataclasses import dataclass, field
from functools import cached_property
from pathlib import Path
from typing import Any

import numpy as np

from record_builder import BuildError
from record_builder.fitting import (
    balanced,
    excess,
    fit_form,
    fit_redlich_kister,
    inverse,
    transformed,
)
from record_builder.forms import Array, Parameters, evaluate
from record_builder.points import Point
from record_builder.solutes import SOLUTE_FITS, SOLUTE_FORMS

__all__ = ["Interface", "Liquid", "Pair", "Subject", "Pure", "columns_of"]

# Transform and basis of the mixture form: one rule per property, so that pairs can be added up.
RULES = {
    "density": ("reciprocal", "mass"),
    "viscosity": ("log", "volume"),
    "surface_tension": ("log", "volume"),
    "refractive_index": ("linear", "volume"),
}
VOLUME_TEMPERATURE = 293.15


def arrays(points: Sequence[Point]) -> tuple[Array, Array, Array, Array]:
    """Temperatures, fractions, values and weights of some points."""
    table = np.array(
        [(p.temperature, p.fraction, p.value, p.weight) for p in points], dtype=float
    ).reshape(-1, 4)
    return table[:, 0], table[:, 1], table[:, 2], table[:, 3]


@dataclass(frozen=True)
class Pure:
    """A finished pure record, read back as the end of a mixture."""

    key: str
    data: Mapping[str, Any]

    @classmethod
    def load(cls, folder: Path, key: str) -> Pure:
        path = folder / f"{key}.toml"
        if not path.exists():
            raise BuildError(f"{key} has no record yet; build the liquid before its mixtures")
        with path.open("rb") as handle:
            return cls(key, tomllib.load(handle))

    @property
    def molar_mass(self) -> float:
        return float(self.data["molar_mass"]["value"])

    @property
    def solute(self) -> bool:
        return self.data.get("kind") == "solute"

    def value(self, prop: str, T: Array) -> Array:
        """Values from the blocks in their order; NaN where none holds. Mixture ranges count."""
        out = np.full(T.shape, np.nan)
        for block in self.data.get(prop, []):
            low, high = block["range"]
            if "mixture_range" in block:
                low = min(low, block["mixture_range"][0])
                high = max(high, block["mixture_range"][1])
            here = np.isnan(out) & ~((low > T) | (high < T))
            if here.any():
                out[here] = evaluate(block["form"], block, T[here])
        return out


@dataclass(frozen=True)
class Subject(ABC):
    """Common ground of liquids and pairs."""

    name: str
    data: Mapping[str, Any]

    @property
    def names(self) -> tuple[str, ...]:
        return (self.name,)

    @property
    def molar_masses(self) -> tuple[float, float] | None:
        return None

    @property
    def metal(self) -> bool:
        return self.data.get("family") in ("metal", "alloy")

    def usable(self, prop: str, points: Sequence[Point]) -> list[bool]:
        """Which points can enter a fit or a comparison."""
        return [True] * len(points)

    @abstractmethod
    def fit(self, prop: str, block: Mapping[str, Any], points: Sequence[Point]) -> Parameters:
        """The parameters of a form that meet the points best."""

    @abstractmethod
    def values(
        self, prop: str, form: str, parameters: Mapping[str, Any], T: Array, w: Array
    ) -> Array:
        """A property by a form and its parameters."""

    def water_slope(
        self, prop: str, form: str, parameters: Mapping[str, Any], T: Array, w: Array
    ) -> Array:
        """Relative change of a property by 0.2 % mass of water."""
        return np.zeros_like(T)


@dataclass(frozen=True)
class Liquid(Subject):
    """A pure liquid, named by its key."""

    def fit(self, prop: str, block: Mapping[str, Any], points: Sequence[Point]) -> Parameters:
        T, _, y, weights = arrays(points)
        sources = [point.source for point in points]
        roots = balanced(weights, sources, bool(block.get("balance", False)))
        return fit_form(block["form"], block, T, y, roots, f"{self.name}: {prop}")

    def values(
        self, prop: str, form: str, parameters: Mapping[str, Any], T: Array, w: Array
    ) -> Array:
        return evaluate(form, parameters, T)


@dataclass(frozen=True)
class Interface(Liquid):
    """Two liquids in contact, keys alphabetical: a function of temperature, as of a pure liquid."""

    @property
    def names(self) -> tuple[str, ...]:
        return tuple(self.data["components"])


@dataclass(frozen=True)
class Pair(Subject):
    """Two components, keys alphabetical, with their finished pure records."""

    folder: Path = field(default=Path())

    @cached_property
    def ends(self) -> tuple[Pure, Pure]:
        a, b = self.names
        return Pure.load(self.folder, a), Pure.load(self.folder, b)

    @property
    def names(self) -> tuple[str, ...]:
        first, second = self.data["components"]
        if first >= second:
            raise BuildError(f"{self.name}: components must be alphabetical")
        return (first, second)

    @property
    def molar_masses(self) -> tuple[float, float]:
        return self.ends[0].molar_mass, self.ends[1].molar_mass

    def composition(self, w: Array, basis: str) -> Array:
        """Fraction of component 1 in another basis, from its mass fraction."""
        if basis == "mass":
            return w
        if basis == "mole":
            per_mass = [1.0 / m for m in self.molar_masses]
        elif basis == "volume":
            at = np.array([VOLUME_TEMPERATURE])
            per_mass = [1.0 / float(end.value("density", at)[0]) for end in self.ends]
            if not all(np.isfinite(per_mass)):
                raise BuildError(f"{self.name}: volume fractions need both densities at 293.15 K")
        else:
            raise BuildError(f"{self.name}: basis {basis!r}; allowed: mass, mole, volume")
        first = w * per_mass[0]
        return np.asarray(first / (first + (1.0 - w) * per_mass[1]))

    def _end_values(self, prop: str, T: Array) -> tuple[Array, Array]:
        return self.ends[0].value(prop, T), self.ends[1].value(prop, T)

    def _dissolved(self, w: Array) -> tuple[Array, Pure, tuple[float, float]]:
        """Mass fraction of the solute, the solvent, and the molar masses of the two.

        The solute is the component without values of its own; the other one is the solvent.
        """
        second_is_solute = self.ends[1].solute
        solvent = self.ends[0 if second_is_solute else 1]
        solute = self.ends[1 if second_is_solute else 0]
        fraction = 1.0 - w if second_is_solute else w
        return fraction, solvent, (solute.molar_mass, solvent.molar_mass)

    def usable(self, prop: str, points: Sequence[Point]) -> list[bool]:
        T, w, _, _ = arrays(points)
        good = (w > 1e-7) & (w < 1.0 - 1e-7)
        for end in self.ends:
            if not end.solute:
                good &= np.isfinite(end.value(prop, T))
        return [bool(flag) for flag in good]

    def fit(self, prop: str, block: Mapping[str, Any], points: Sequence[Point]) -> Parameters:
        T, w, y, weights = arrays(points)
        if block.get("form") in SOLUTE_FITS:
            roots = balanced(
                weights, [point.source for point in points], bool(block.get("balance", False))
            )
            solute, solvent, masses = self._dissolved(w)
            return SOLUTE_FITS[block["form"]](
                block, T, solute, y, solvent.value(prop, T), masses, roots, f"{self.name}: {prop}"
            )
        if prop not in RULES:
            raise BuildError(f"{self.name}: no mixing rule for {prop}; known: {', '.join(RULES)}")
        transform, basis = RULES[prop]
        sources = [point.source for point in points]
        rows = fit_redlich_kister(
            self.composition(w, basis),
            T,
            y,
            self._end_values(prop, T),
            columns_of(block),
            transform,
            balanced(weights, sources, bool(block.get("balance", False))),
            robust=str(block.get("robust", "")),
            ridge=float(block.get("ridge", 1e-6)),
            what=f"{self.name}: {prop}",
        )
        return {"transform": transform, "basis": basis, "coefficients": rows}

    def values(
        self, prop: str, form: str, parameters: Mapping[str, Any], T: Array, w: Array
    ) -> Array:
        if form in SOLUTE_FORMS:
            solute, solvent, masses = self._dissolved(w)
            return SOLUTE_FORMS[form](parameters, T, solute, solvent.value(prop, T), masses)
        if form != "redlich_kister":
            raise BuildError(f"{self.name}: form {form!r} is none of a mixture")
        transform = parameters["transform"]
        x1 = self.composition(w, parameters["basis"])
        y1, y2 = self._end_values(prop, T)
        f = x1 * transformed(y1, transform) + (1.0 - x1) * transformed(y2, transform)
        return inverse(f + excess(x1, T, parameters["coefficients"]), transform)

    def water_slope(
        self, prop: str, form: str, parameters: Mapping[str, Any], T: Array, w: Array
    ) -> Array:
        if "water" not in self.names:
            return np.zeros_like(T)
        other = np.clip(w, 0.002, 0.998)
        up = self.values(prop, form, parameters, T, other + 0.001)
        down = self.values(prop, form, parameters, T, other - 0.001)
        return np.asarray(np.abs(np.log(up / down)))


def columns_of(block: Mapping[str, Any]) -> list[int]:
    """Powers of temperature in each row of the mixture form."""
    rows, columns = int(block["rows"]), block["columns"]
    listed = [int(columns)] * rows if isinstance(columns, int) else [int(c) for c in columns]
    if len(listed) != rows or min(listed) < 1:
        raise BuildError(f"rows = {rows} does not go with columns = {columns}")
    return listed
