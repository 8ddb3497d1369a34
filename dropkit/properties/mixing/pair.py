"""The records of one pair of liquids for one property: which of them serves where."""

from __future__ import annotations

from collections.abc import Sequence
from typing import Any

import numpy as np

from dropkit.properties.curves import FloatArray
from dropkit.properties.mixing.redlich_kister import PairExcess
from dropkit.records import PropertyRecord
from dropkit.validity import Range

__all__ = ["Pair", "share_of"]


def share_of(first: Any, second: Any) -> Any:
    """first/(first + second), 0 where both are absent; floats or arrays."""
    total = first + second
    if isinstance(total, np.ndarray):
        return np.divide(first, total, out=np.zeros(total.shape), where=total > 0.0)
    return first / total if total > 0.0 else 0.0


class Pair:
    """Records of a pair in order of preference: the first that holds a point serves it.

    Parameters
    ----------
    first, second : int
        Numbers of the two components, in the order of the record.
    blocks : sequence of PropertyRecord
        Of form ``redlich_kister``, at least one.
    """

    def __init__(self, first: int, second: int, blocks: Sequence[PropertyRecord]) -> None:
        self.first, self.second = first, second
        self.blocks = tuple(blocks)
        self.excesses = tuple(PairExcess(block) for block in blocks)
        self.shares = tuple(
            (float(low), float(high))
            for low, high in (b.parameters.get("fraction_range", (0.0, 1.0)) for b in blocks)
        )

        # The range of the preferred record, if it holds any composition: most points need no more.
        self.whole = self.blocks[0].range if self.shares[0] == (0.0, 1.0) else None

    def holding(self, share: float) -> list[int]:
        """Numbers of the records whose composition range holds a mass share of the first."""
        return [k for k, (low, high) in enumerate(self.shares) if low <= share <= high]

    def without_gaps(self, share: float) -> bool:
        """Whether the records that hold a share serve all temperatures between their ends."""
        held = sorted((self.blocks[k].range for k in self.holding(share)), key=lambda r: r.low)
        if not held:
            return False
        high = held[0].high
        for limits in held[1:]:
            if limits.low > high:
                return False
            high = max(high, limits.high)
        return True

    def range(self, share: float | None) -> Range:
        """Temperatures that some record serves, at a share or (None) at any."""
        chosen = list(range(len(self.blocks))) if share is None else self.holding(share)
        found = [self.blocks[k].range for k in chosen or range(len(self.blocks))]
        return Range(min(r.low for r in found), max(r.high for r in found))

    def share_range(self, what: str) -> Range:
        """Mass shares of the first that some record serves."""
        return Range(
            min(low for low, _ in self.shares), max(high for _, high in self.shares), what, ""
        )

    def serving(self, share: float, temperature: float) -> int:
        """Number of the record for one point; outside all of them the nearest in temperature."""
        held = self.holding(share) or list(range(len(self.blocks)))
        limits = [self.blocks[k].range for k in held]
        gaps = [max(r.low - temperature, temperature - r.high, 0.0) for r in limits]
        return held[gaps.index(min(gaps))]

    def serve(self, share: Any, temperature: FloatArray) -> np.ndarray[Any, np.dtype[np.intp]]:
        """Number of the record for each point of an array; -1 where none holds it."""
        number = np.full(np.broadcast_shapes(np.shape(share), temperature.shape), -1)
        for k in range(len(self.blocks) - 1, -1, -1):
            limits, (low, high) = self.blocks[k].range, self.shares[k]
            holds = (temperature >= limits.low) & (temperature <= limits.high)
            number[holds & (share >= low) & (share <= high)] = k
        return number

    def add(
        self,
        fractions: tuple[Any, Any],
        masses: tuple[Any, Any],
        temperature: FloatArray,
        reduced: FloatArray,
        out: FloatArray,
        *,
        binary: bool,
    ) -> None:
        """Add the excess to `out`, a flat chunk, each point by the record that serves it."""
        if len(self.blocks) == 1 or (self.whole is not None and self.whole.covers(temperature)):
            self.excesses[0].add(*fractions, reduced, out, binary=binary)
            return
        share = share_of(*masses)
        number = self.serve(share, temperature)
        lost = np.flatnonzero(number < 0)
        if lost.size:
            # Only reached where the user asked for values outside the range.
            shares = np.broadcast_to(share, number.shape)
            number[lost] = [self.serving(float(shares[k]), float(temperature[k])) for k in lost]
        for k, excess in enumerate(self.excesses):
            chosen = number == k
            if chosen.all():
                excess.add(*fractions, reduced, out, binary=binary)
            elif chosen.any():
                parts = [x[chosen] if isinstance(x, np.ndarray) else x for x in fractions]
                part = out[chosen]
                excess.add(parts[0], parts[1], reduced[chosen], part, binary=binary)
                out[chosen] = part
