"""Deviations in one place: what the reports and the records quote."""

from __future__ import annotations

import math
from collections.abc import Sequence
from dataclasses import dataclass
from typing import Any

import numpy as np

from record_builder.forms import Array
from record_builder.points import Point

__all__ = ["Deviation", "absolute", "by_source", "quantile", "relative", "round_up", "summary"]


@dataclass(frozen=True, slots=True)
class Deviation:
    """A point beside what the fit says there, and the part that the point played."""

    point: Point
    fitted: float
    role: str

    @property
    def relative(self) -> float:
        return self.fitted / self.point.value - 1.0


def relative(deviations: Sequence[Deviation]) -> Array:
    """Relative deviations, fitted against published."""
    return np.array([d.relative for d in deviations], dtype=float)


def absolute(deviations: Sequence[Deviation]) -> Array:
    """Deviations in SI."""
    return np.array([d.fitted - d.point.value for d in deviations], dtype=float)


def quantile(values: Array, share: float) -> float:
    """A quantile of absolute values that never lies below the observed one."""
    return float(np.quantile(np.abs(values), share, method="higher"))


def round_up(value: float, digits: int = 2) -> float:
    """Rounded upwards to a few digits, so that a band never shrinks by printing."""
    if value <= 0.0:
        return 0.0
    step = 10.0 ** (math.floor(math.log10(value)) - digits + 1)
    return float(f"{math.ceil(value / step - 1e-9) * step:.{digits}g}")


def summary(values: Array) -> dict[str, Any]:
    """Count, mean, median, 95 % quantile and worst of relative deviations."""
    size = np.abs(values)
    return {
        "points": len(values),
        "bias": float(f"{values.mean():.3g}"),
        "median": float(f"{np.median(size):.3g}"),
        "p95": float(f"{quantile(values, 0.95):.3g}"),
        "worst": float(f"{size.max():.3g}"),
    }


def by_source(deviations: Sequence[Deviation]) -> dict[str, Any]:
    """`summary` of each source."""
    groups: dict[str, list[Deviation]] = {}
    for deviation in deviations:
        groups.setdefault(deviation.point.source, []).append(deviation)
    return {source: summary(relative(group)) for source, group in sorted(groups.items())}
