"""A user's numbers for one property: read from any form, and evaluated over temperature."""

from __future__ import annotations

import math
from collections.abc import Mapping
from dataclasses import dataclass
from itertools import pairwise
from typing import Any, Final

import numpy as np

from dropkit import units
from dropkit.errors import BadInput
from dropkit.properties.curves import FloatArray
from dropkit.properties.property_words import property_name
from dropkit.validity import Range

__all__ = ["OwnCurve", "read_values"]

# A value stated at one temperature serves this far around it.
AROUND: Final = 0.5  # K
# Straight lines in ln(y) over 1/T for these, in y over T for the rest.
_EXPONENTIAL: Final = ("viscosity", "kinematic_viscosity", "vapour_pressure")


@dataclass(frozen=True, slots=True)
class OwnCurve:
    """Values of one property: a constant, one at a stated temperature, or (T, value) pairs.

    Parameters
    ----------
    quantity : str
        What it gives.
    temperatures, values : tuple of float
        Pairs [K, SI]; empty temperatures mean a constant at all temperatures.
    """

    quantity: str
    temperatures: tuple[float, ...]
    values: tuple[float, ...]

    @property
    def range(self) -> Range:
        """Where the values hold."""
        if not self.temperatures:
            return Range(0.0, math.inf)
        if len(self.temperatures) == 1:
            return Range(self.temperatures[0] - AROUND, self.temperatures[0] + AROUND)
        return Range(self.temperatures[0], self.temperatures[-1])

    @property
    def method(self) -> str:
        """The rule in one line."""
        if not self.temperatures:
            return "own value, held constant over temperature"
        if len(self.temperatures) == 1:
            return f"own value at {self.temperatures[0] - 273.15:g} degC"
        line = "ln(value) over 1/T" if self.quantity in _EXPONENTIAL else "value over T"
        return f"own {len(self.values)} values, straight lines in {line}"

    def scalar(self, temperature: float) -> float:
        """Value at one temperature.

        Parameters
        ----------
        temperature : float
            Temperature [K].

        Returns
        -------
        float
            In SI.
        """
        if len(self.values) == 1:
            return self.values[0]
        return float(self.array(np.array([temperature]))[0])

    def array(self, temperature: FloatArray) -> FloatArray:
        """Values at some temperatures; end segments go on outside.

        Parameters
        ----------
        temperature : ndarray
            Temperatures [K].

        Returns
        -------
        ndarray
            In SI, in the same shape.
        """
        if len(self.values) == 1:
            # A constant fills no gaps: NaN stays NaN.
            return np.where(np.isnan(temperature), np.nan, self.values[0])
        curved = self.quantity in _EXPONENTIAL
        x = 1.0 / temperature if curved else temperature
        known = np.array(self.temperatures)
        place = np.clip(np.searchsorted(known, temperature, side="right") - 1, 0, known.size - 2)
        nodes = 1.0 / known if curved else known
        y = np.log(self.values) if curved else np.array(self.values)
        slope = np.diff(y) / np.diff(nodes)
        # Far outside, where the user asked for it, a line may overflow; that becomes NaN.
        with np.errstate(all="ignore"):
            line = y[place] + slope[place] * (x - nodes[place])
            return np.exp(line) if curved else line


def read_values(values: Mapping[str, Any], at: Any, plausible: bool) -> dict[str, OwnCurve]:
    """Curves from properties by name, each a number, one with a unit, or pairs."""
    where = None if at is None else units.single(at, "temperature", "at", plausible=plausible)
    return {
        property_name(prop): _read_one(prop, value, where, plausible)
        for prop, value in values.items()
    }


def _read_one(prop: str, value: Any, at: float | None, plausible: bool) -> OwnCurve:
    pairs = _as_pairs(value)
    if pairs is None:
        number = units.single(value, prop, prop, plausible=plausible)
        return OwnCurve(prop, () if at is None else (at,), (number,))
    known = sorted(
        (
            units.single(t, "temperature", f"temperature of {prop}", plausible=plausible),
            units.single(y, prop, prop, plausible=plausible),
        )
        for t, y in pairs
    )
    if not known:
        raise BadInput(f"{prop} has no pairs", allowed="at least one (temperature, value) pair")
    for (first, _), (second, _) in pairwise(known):
        if first == second:
            raise BadInput(f"{prop} is given twice at {first:g} K", allowed="one value each")
    return OwnCurve(prop, tuple(t for t, _ in known), tuple(y for _, y in known))


def _as_pairs(value: Any) -> list[tuple[Any, Any]] | None:
    """A list of (temperature, value) pairs, or None where `value` is a single value."""
    if isinstance(value, np.ndarray) and value.ndim == 2 and value.shape[1] == 2:
        return [(float(t), float(y)) for t, y in value]
    if not isinstance(value, list):
        return None
    if not all(isinstance(item, list | tuple) and len(item) == 2 for item in value):
        return None
    return [(item[0], item[1]) for item in value]
