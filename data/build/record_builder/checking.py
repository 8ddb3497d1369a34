"""Check points of a record: chosen from the data, and computed back from the record."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from typing import Any

import numpy as np

from record_builder import BuildError
from record_builder.statistics import Deviation, round_up
from record_builder.subjects import Subject

__all__ = ["chosen_checks", "verify"]

_NEAREST = 3


def chosen_checks(
    deviations: Sequence[Deviation], record: Mapping[str, Any]
) -> list[dict[str, Any]]:
    """Up to three checks: near 298.15 K, at the low end, at the high end.

    Of the three points nearest to each temperature the one of median deviation is taken, so
    that a check is neither the luckiest point nor a stray one. The tolerance is twice the
    record's standard uncertainty: where a point lies further off, that is to be widened or the
    spec to name other checks.
    """
    low, high = record["range"]
    inside = [d for d in deviations if low <= d.point.temperature <= high]
    checks: list[dict[str, Any]] = []
    for target in (min(max(298.15, low), high), low, high):
        near = sorted(inside, key=lambda d: abs(d.point.temperature - target))[:_NEAREST]
        if not near:
            break
        near.sort(key=lambda d: d.relative)
        point = near[len(near) // 2].point
        check: dict[str, Any] = {"T": point.temperature}
        if not np.isnan(point.fraction):
            check["fraction"] = float(f"{point.fraction:.8g}")
        wider = record["uncertainty"]
        if "uncertainty_absolute" in record:
            wider = max(wider, record["uncertainty_absolute"] / point.value)
        place = f"data/published/{point.file}.csv" + (f", {point.doi}" if point.doi else "")
        check |= {"value": point.value, "source": point.key, "place": place}
        check["tolerance"] = round_up(2.0 * wider, 3)
        if check not in checks:
            checks.append(check)
    return checks


def verify(subject: Subject, prop: str, record: Mapping[str, Any]) -> None:
    """Compute every check of a record back from the record."""
    if not record["checks"]:
        raise BuildError(f"{subject.name}: {prop} has no check point; give checks or a second")
    for check in record["checks"]:
        for name in ("T", "value", "source", "place", "tolerance"):
            if name not in check:
                raise BuildError(f"{subject.name}: a check of {prop} lacks {name}")
        T = np.array([float(check["T"])])
        w = np.array([float(check.get("fraction", np.nan))])
        value = float(subject.values(prop, record["form"], record, T, w)[0])
        deviation = value / float(check["value"]) - 1.0
        if not abs(deviation) <= float(check["tolerance"]):
            raise BuildError(
                f"{subject.name}: {prop} gives {value:.6g} at {check['T']} K, the check "
                f"{check['source']} {check['value']:.6g}: {100 * deviation:.3g} % off, allowed "
                f"{100 * float(check['tolerance']):.3g} %"
            )
