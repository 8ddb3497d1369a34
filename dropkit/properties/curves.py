"""A property of one pure liquid over temperature, compiled from its records for speed.

Several records of one property stand in order of preference: the first whose range
holds the temperature serves it. Everything here is SI and unaware of units.
"""

from __future__ import annotations

import math
from collections.abc import Callable, Sequence
from itertools import pairwise
from typing import Any, NamedTuple, TypeAlias

import numpy as np

from dropkit.errors import RecordError
from dropkit.properties.equations import FORMS, ArrayBody, ScalarBody
from dropkit.records import PropertyRecord
from dropkit.validity import Range

__all__ = ["CHUNK", "Curve", "Fast", "FloatArray", "stepwise"]

FloatArray: TypeAlias = "np.ndarray[Any, np.dtype[np.float64]]"

# Elements per chunk: the work buffers of one chunk stay in the cache of a core.
CHUNK = 16_384


class Fast(NamedTuple):
    """What a scalar look-up needs and no more.

    Parameters
    ----------
    low, high : float
        Ends of the range [K].
    value : callable
        The property [SI] at a temperature [K] between them.
    """

    low: float
    high: float
    value: Callable[[float], float]


class Curve:
    """One property of a pure liquid: evaluators and ranges.

    Parameters
    ----------
    records : sequence of PropertyRecord
        In order of preference, at least one.
    inside_mixtures : bool
        Use the wider range that a record may state for use inside mixtures only.
    """

    def __init__(self, records: Sequence[PropertyRecord], *, inside_mixtures: bool = False) -> None:
        self.records = tuple(records)
        self.ranges = tuple(
            (record.mixture_range or record.range) if inside_mixtures else record.range
            for record in records
        )
        self.range = _union(self.records, self.ranges)
        bodies = [_bodies(record) for record in records]
        self._scalars = [scalar for scalar, _ in bodies]
        self._arrays = [array for _, array in bodies]
        ends = sorted({end for limits in self.ranges for end in (limits.low, limits.high)})
        middles = [0.5 * (a + b) for a, b in pairwise(ends)]
        self._ends = np.array(ends)
        self._at_end = np.array([self.serving(end) for end in ends])
        self._between = np.array(
            [self.serving(t) for t in (ends[0] - 1.0, *middles, ends[-1] + 1.0)]
        )
        self.scalar = stepwise(
            ends,
            [self._scalars[k] for k in self._between],
            [self._scalars[k] for k in self._at_end],
        )

    @property
    def fast(self) -> Fast:
        """Ends of the range and the scalar evaluator."""
        return Fast(self.range.low, self.range.high, self.scalar)

    @property
    def by_engine(self) -> bool:
        """Whether an engine, not an equation held here, gives some of it."""
        return any("engine" in record.parameters for record in self.records)

    def serving(self, temperature: float) -> int:
        """Which record serves a temperature.

        Parameters
        ----------
        temperature : float
            Temperature [K].

        Returns
        -------
        int
            Place in `records`; outside all ranges that of the nearest.
        """
        for number, limits in enumerate(self.ranges):
            if limits.low <= temperature <= limits.high:
                return number
        gaps = [max(r.low - temperature, temperature - r.high) for r in self.ranges]
        return gaps.index(min(gaps))

    def serve(self, temperature: FloatArray) -> np.ndarray[Any, np.dtype[np.intp]]:
        """Which record serves each of some temperatures.

        Parameters
        ----------
        temperature : ndarray
            Temperatures [K].

        Returns
        -------
        ndarray of int
            Places in `records`.
        """
        # Between two neighbouring ends one record serves throughout.
        place = np.searchsorted(self._ends, temperature)
        number: np.ndarray[Any, np.dtype[np.intp]] = self._between[place]
        at_end = self._ends[np.minimum(place, self._ends.size - 1)] == temperature
        number[at_end] = self._at_end[place[at_end]]
        return number

    def fill(self, temperature: FloatArray, out: FloatArray) -> None:
        """Write the property into an array in place.

        Parameters
        ----------
        temperature : ndarray
            Temperatures [K], flat.
        out : ndarray
            What takes the values [SI], of the same size.
        """
        if len(self.ranges) == 1:
            self._arrays[0](temperature, out)
            return
        number = self.serve(temperature)
        for index, write in enumerate(self._arrays):
            chosen = np.flatnonzero(number == index)
            if chosen.size == out.size:
                write(temperature, out)
            elif chosen.size:
                part = np.empty(chosen.size)
                write(temperature[chosen], part)
                out[chosen] = part


def stepwise(
    ends: Sequence[float],
    between: Sequence[Callable[[float], float]],
    at_end: Sequence[Callable[[float], float]],
) -> Callable[[float], float]:
    """One function of temperature from the functions that serve its stretches.

    Parameters
    ----------
    ends : sequence of float
        Ends of the stretches [K], rising.
    between : sequence of callables
        What serves below the first end, between the ends, and above the last.
    at_end : sequence of callables
        What serves exactly at each end.
    """
    table: list[tuple[float, Callable[[float], float]]] = []

    def put(high: float, function: Callable[[float], float]) -> None:
        if table and table[-1][1] is function:
            table.pop()
        table.append((high, function))

    for end, below, here in zip(ends, between, at_end, strict=False):
        if here is not below:
            put(math.nextafter(end, -math.inf), below)
        put(end, here)
    put(math.inf, between[-1])
    if len(table) == 1:
        return table[0][1]

    def value(temperature: float) -> float:
        for high, function in table:
            if temperature <= high:
                return function(temperature)
        return math.nan

    return value


def _bodies(record: PropertyRecord) -> tuple[ScalarBody, ArrayBody]:
    """The evaluators of a record: of its equation, or of the engine that it names."""
    if "engine" in record.parameters:
        # Imported here: only what dropkit has no record of needs the engines.
        from dropkit.properties.engines import engine_bodies

        return engine_bodies(record)
    form = FORMS[record.form]
    return form.scalar(record.parameters), form.array(record.parameters)


def _union(records: Sequence[PropertyRecord], ranges: Sequence[Range]) -> Range:
    ordered = sorted(ranges, key=lambda limits: limits.low)
    high = ordered[0].high
    for limits in ordered[1:]:
        if limits.low > high:
            raise RecordError(
                f"{records[0].label}: the ranges of its records leave a gap from {high:g} "
                f"to {limits.low:g} K"
            )
        high = max(high, limits.high)
    return Range(ordered[0].low, high)
