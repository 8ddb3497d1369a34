"""Check points of a record: chosen from the data, and computed back from the record."""

from __future__ import annotations

import math
from collections.abc import Collection, Mapping, Sequence
from typing import Any

import numpy as np

from record_builder import BuildError
from record_builder.statistics import Deviation
from record_builder.subjects import Subject

__all__ = ["chosen_checks", "given_checks", "verify"]

_NEAREST = 3


def chosen_checks(
    deviations: Sequence[Deviation],
    record: Mapping[str, Any],
    shown: Collection[str],
    count: int = 3,
) -> list[dict[str, Any]]:
    """Up to three checks: near 298.15 K, at the low end, at the high end; or the first of them.

    Of the three points nearest to each temperature the one of median deviation is taken, so
    that a check is neither the luckiest point nor a stray one. Where a point lies further off
    than twice the record's standard uncertainty, that is to be widened or the spec to name other
    checks. Of a point that stands in one of the record's files of points only the paper is said.
    """
    low, high = record["range"]
    inside = [d for d in deviations if low <= d.point.temperature <= high]
    checks: list[dict[str, Any]] = []
    for target in (min(max(298.15, low), high), low, high)[:count]:
        near = sorted(inside, key=lambda d: abs(d.point.temperature - target))[:_NEAREST]
        if not near:
            break
        near.sort(key=lambda d: d.relative)
        point = near[len(near) // 2].point
        check: dict[str, Any] = {"T": point.temperature}
        if not np.isnan(point.fraction):
            check["fraction"] = float(f"{point.fraction:.8g}")
        check |= {"value": point.value, "source": point.key}
        if point.doi.startswith("10."):
            check["place"] = point.doi
        elif point.file not in shown:
            stem = point.file.rpartition("/")[2]
            check["place"] = f"{stem}, {point.doi}" if point.doi else stem
        if check not in checks:
            checks.append(check)
    return checks


def given_checks(
    checks: Sequence[Mapping[str, Any]], record: Mapping[str, Any], what: str
) -> list[dict[str, Any]]:
    """The checks of a spec, without what a record says by silence: its own place and 95 % band."""
    found = []
    for check in checks:
        for name in ("T", "value", "source", "place"):
            if name not in check:
                raise BuildError(f"{what}: a check of the spec lacks {name}")
        said = dict(check)
        if said["place"] == record["place"]:
            del said["place"]
        elif said["place"].startswith("data/published/"):
            said["place"] = said["place"].rpartition("/")[2].removesuffix(".csv")
        band = 2.0 * _uncertainty(record, float(check["value"]))
        if "tolerance" in said and math.isclose(said["tolerance"], band, rel_tol=1e-9):
            del said["tolerance"]
        found.append(said)
    return found


def _uncertainty(record: Mapping[str, Any], value: float) -> float:
    """Standard uncertainty of a record at one of its values, as its reader has it."""
    return float(max(record["uncertainty"], record.get("uncertainty_absolute", 0.0) / value))


def verify(subject: Subject, prop: str, record: Mapping[str, Any]) -> None:
    """Compute every check of a record back from the record."""
    if not record["checks"]:
        raise BuildError(f"{subject.name}: {prop} has no check point; give checks or a second")
    for check in record["checks"]:
        T = np.array([float(check["T"])])
        w = np.array([float(check.get("fraction", np.nan))])
        value = float(subject.values(prop, record["form"], record, T, w)[0])
        deviation = value / float(check["value"]) - 1.0
        allowed = float(check.get("tolerance", 2.0 * _uncertainty(record, float(check["value"]))))
        if not abs(deviation) <= allowed:
            raise BuildError(
                f"{subject.name}: {prop} gives {value:.6g} at {check['T']} K, the check "
                f"{check['source']} {check['value']:.6g}: {100 * deviation:.3g} % off, allowed "
                f"{100 * allowed:.3g} %"
            )
