"""The published points behind a record, for plots and comparisons."""

from __future__ import annotations

from collections.abc import Iterable, Iterator, Mapping
from dataclasses import dataclass
from functools import cache

import numpy as np

from dropkit import records
from dropkit.errors import RecordError
from dropkit.properties.curves import FloatArray
from dropkit.published_rows import published_file
from dropkit.records import PropertyRecord

__all__ = ["Points", "exclusion", "pair_points", "pure_points"]


@dataclass(frozen=True)
class Points:
    """Published points of one property from one file.

    Parameters
    ----------
    source : str
        Key of its source.
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
    return tuple(published_file(path, name))


@cache
def _exclusions() -> dict[str, list[dict[str, str]]]:
    path = records.data_dir() / "published" / "excluded.csv"
    listed: dict[str, list[dict[str, str]]] = {}
    if path.is_file():
        for row in published_file(path):
            listed.setdefault(row["file"], []).append(row)
    return listed


def exclusion(file: str, row: Mapping[str, str]) -> str:
    """Why a published row is excluded, or an empty text.

    Parameters
    ----------
    file : str
        Name within ``data/published``, such as ``"liquids/Jasper1972"``.
    row : mapping
        The row as published; empty numbers of the list of exclusions match any.
    """
    first = row.get("component_1", row.get("liquid", ""))
    for listed in _exclusions().get(file, ()):
        named = (
            listed["component_1"] == first
            and listed["component_2"] == row.get("component_2", "")
            and listed["property"] == row["property"]
        )
        if named and all(
            _same(listed[column], row.get(column, "")) for column in ("T_K", "fraction_1", "value")
        ):
            return listed["reason"]
    return ""


def _same(listed: str, given: str) -> bool:
    if not listed:
        return True
    return given != "" and abs(float(listed) - float(given)) <= 1e-6 * abs(float(given))


def _source(name: str) -> str:
    """Key of a file's source: its name up to the first underscore."""
    return name.rpartition("/")[2].partition("_")[0]


def _files(blocks: Iterable[PropertyRecord]) -> list[str]:
    return list(dict.fromkeys(name for block in blocks for name in block.points))


def pure_points(key: str, prop: str) -> Iterator[Points]:
    """Points of a pure liquid that its records were fitted to or checked with, by file."""
    for name in _files(records.liquid_record(key).properties.get(prop, ())):
        chosen = [
            row
            for row in _rows(name)
            if row["liquid"] == key and row["property"] == prop and not exclusion(name, row)
        ]
        if chosen:
            yield Points(
                _source(name),
                np.array([float(row["T_K"]) for row in chosen]),
                np.array([float(row["value"]) for row in chosen]),
                np.full(len(chosen), np.nan),
            )


def pair_points(first: str, second: str, prop: str) -> Iterator[Points]:
    """Points of a pair by file; the fraction is that of the alphabetically first component."""
    a, b = sorted((first, second))
    found = records.pair_record(a, b)
    for name in _files(found.properties.get(prop, ()) if found else ()):
        chosen = [
            row
            for row in _rows(name)
            if (row["component_1"], row["component_2"]) == (a, b)
            and row["property"] == prop
            and not exclusion(name, row)
        ]
        for basis in sorted({row["basis"] for row in chosen}):
            mine = [row for row in chosen if row["basis"] == basis]
            yield Points(
                _source(name),
                np.array([float(row["T_K"]) for row in mine]),
                np.array([float(row["value"]) for row in mine]),
                np.array([float(row["fraction_1"]) for row in mine]),
                basis,
            )
