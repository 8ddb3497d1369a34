"""The published points behind a record, for plots and comparisons."""

from __future__ import annotations

import csv
from collections.abc import Iterable, Iterator
from dataclasses import dataclass
from functools import cache

import numpy as np

from dropkit import records
from dropkit.errors import RecordError
from dropkit.properties.curves import FloatArray
from dropkit.records import PropertyRecord

__all__ = ["Points", "pair_points", "pure_points"]


@dataclass(frozen=True)
class Points:
    """Published points of one property from one file.

    Parameters
    ----------
    source : str
        Name of the file, which is the key of its source.
    temperature, value : ndarray
        Temperature [K] and value [SI].
    fraction : ndarray
        Fraction of the first component; NaN for pure liquids.
    basis : str
        Basis of the fraction; empty for pure liquids.
    """

    source: str
    temperature: FloatArray
    value: FloatArray
    fraction: FloatArray
    basis: str = ""


@cache
def _rows(name: str) -> tuple[dict[str, str], ...]:
    path = records.data_dir() / "published" / f"{name}.csv"
    if not path.is_file():
        raise RecordError(f"published/{name}.csv is missing", hint="Correct `points` in the record")
    with path.open(encoding="utf-8", newline="") as lines:
        return tuple(csv.DictReader(line for line in lines if not line.startswith("#")))


@cache
def _excluded() -> frozenset[tuple[str, ...]]:
    path = records.data_dir() / "published" / "excluded.csv"
    if not path.is_file():
        return frozenset()
    with path.open(encoding="utf-8", newline="") as lines:
        rows = csv.DictReader(line for line in lines if not line.startswith("#"))
        return frozenset(
            (r["file"], r["component_1"], r["property"], r["T_K"], r["fraction_1"], r["value"])
            for r in rows
        )


def _files(blocks: Iterable[PropertyRecord]) -> list[str]:
    return list(dict.fromkeys(name for block in blocks for name in block.points))


def pure_points(key: str, prop: str) -> Iterator[Points]:
    """Points of a pure liquid that its records were fitted to or checked with, by file."""
    for name in _files(records.liquid_record(key).properties.get(prop, ())):
        out = _excluded()
        chosen = [
            row
            for row in _rows(name)
            if row["liquid"] == key
            and row["property"] == prop
            and (name, key, prop, row["T_K"], "", row["value"]) not in out
        ]
        if chosen:
            yield Points(
                name.rpartition("/")[2],
                np.array([float(row["T_K"]) for row in chosen]),
                np.array([float(row["value"]) for row in chosen]),
                np.full(len(chosen), np.nan),
            )


def pair_points(first: str, second: str, prop: str) -> Iterator[Points]:
    """Points of a pair by file; the fraction is that of the alphabetically first component."""
    a, b = sorted((first, second))
    found = records.pair_record(a, b)
    for name in _files(found.properties.get(prop, ()) if found else ()):
        out = _excluded()
        chosen = [
            row
            for row in _rows(name)
            if (row["component_1"], row["component_2"]) == (a, b)
            and row["property"] == prop
            and (name, a, prop, row["T_K"], row["fraction_1"], row["value"]) not in out
        ]
        for basis in sorted({row["basis"] for row in chosen}):
            mine = [row for row in chosen if row["basis"] == basis]
            yield Points(
                name.rpartition("/")[2],
                np.array([float(row["T_K"]) for row in mine]),
                np.array([float(row["value"]) for row in mine]),
                np.array([float(row["fraction_1"]) for row in mine]),
                basis,
            )
