"""Published points: reading the long-format files, selecting, excluding."""

from __future__ import annotations

import math
import tomllib
from collections.abc import Mapping, Sequence
from dataclasses import dataclass, replace
from pathlib import Path
from typing import Any

from dropkit.published_rows import published_file
from dropkit.record_types import INTERFACIAL
from record_builder import BuildError

__all__ = ["Point", "Published", "mass_fraction", "within"]

_SELECTION_KEYS = {"file", "doi", "not_doi", "T", "fraction", "weight", "every"}


@dataclass(frozen=True, slots=True)
class Point:
    """One published value in SI; `fraction` is the mass fraction of component 1 (NaN if pure)."""

    file: str
    doi: str
    temperature: float
    fraction: float
    value: float
    weight: float = 1.0
    excluded: str = ""

    @property
    def key(self) -> str:
        """The source key: the file's name up to the first underscore."""
        return self.file.rsplit("/", 1)[-1].split("_", 1)[0]

    @property
    def source(self) -> str:
        """What counts as one source: the key, with the doi where the file gives one."""
        return f"{self.key} {self.doi}" if self.doi else self.key


def within(point: Point, temperatures: Sequence[float], fractions: Sequence[float]) -> bool:
    """Whether a point lies in a range, with a hair of room for rounded temperatures."""
    if not temperatures[0] - 0.02 <= point.temperature <= temperatures[1] + 0.02:
        return False
    return math.isnan(point.fraction) or (
        fractions[0] - 1e-9 <= point.fraction <= fractions[1] + 1e-9
    )


def mass_fraction(fraction: float, basis: str, molar_masses: tuple[float, float]) -> float:
    """Mass fraction of component 1 from its mass or mole fraction."""
    if basis == "mass":
        return fraction
    if basis == "mole":
        mass = fraction * molar_masses[0]
        return mass / (mass + (1.0 - fraction) * molar_masses[1])
    raise BuildError(f"basis {basis!r} of a published point; allowed: mass, mole")


def _number(text: str, path: Path, column: str) -> float:
    try:
        value = float(text)
    except (TypeError, ValueError):
        raise BuildError(f"{path.name}: {text!r} in column {column} is no number") from None
    if not math.isfinite(value):
        raise BuildError(f"{path.name}: {text!r} in column {column} is not finite")
    return value


class Published:
    """The folder `data/published`, with its list of excluded points."""

    def __init__(self, folder: Path) -> None:
        self.folder = folder
        listed = folder / "excluded.csv"
        self.exclusions = published_file(listed) if listed.exists() else []
        self._rows: dict[str, list[dict[str, str]]] = {}

    def origins(self, key: str) -> set[str]:
        """A source and everything that it is based on, by the files in `data/sources`."""
        found: set[str] = set()
        waiting = [key]
        while waiting:
            name = waiting.pop()
            if name in found:
                continue
            found.add(name)
            path = self.folder.parent / "sources" / f"{name}.toml"
            if path.exists():
                entry = tomllib.loads(path.read_text(encoding="utf-8"))
                waiting += [base.split("_", 1)[0] for base in entry.get("based_on", [])]
        return found

    def _reason(
        self,
        file: str,
        names: tuple[str, str],
        prop: str,
        given: Mapping[str, float],
    ) -> str:
        """Why a point is excluded, or an empty text. Empty cells of the list match anything."""
        for row in self.exclusions:
            listed = row["file"].removesuffix(".csv")
            if listed not in (file, file.rsplit("/", 1)[-1]):
                continue
            if row["component_1"] and row["component_1"] != names[0]:
                continue
            if row["component_2"] and row["component_2"] != names[1]:
                continue
            if row["property"] and row["property"] != prop:
                continue
            close = {"T_K": 0.006, "fraction_1": 1e-5, "value": 1e-6 * abs(given["value"])}
            if all(
                not row[column] or abs(float(row[column]) - given[column]) <= tolerance
                for column, tolerance in close.items()
            ):
                return row["reason"] or "listed in excluded.csv"
        return ""

    def read(
        self,
        file: str,
        prop: str,
        names: tuple[str, ...],
        molar_masses: tuple[float, float] | None = None,
    ) -> list[Point]:
        """All points of one property of a liquid, of a pair or of an interface, in one file."""
        path = self.folder / f"{file}.csv"
        if not path.exists():
            raise BuildError(f"no published file {file}.csv")
        found = []
        if file not in self._rows:
            self._rows[file] = published_file(path, file)
        for row in self._rows[file]:
            # Files of interfaces hold one property, and have no column for it.
            if row.get("property", INTERFACIAL) != prop:
                continue
            fraction = listed = math.nan
            if prop == INTERFACIAL:
                if (row["liquid_1"], row["liquid_2"]) != names:
                    continue
            elif len(names) == 1:
                if row["liquid"] != names[0]:
                    continue
            else:
                if (row["component_1"], row["component_2"]) != names:
                    continue
                assert molar_masses is not None
                listed = _number(row["fraction_1"], path, "fraction_1")
                fraction = mass_fraction(listed, row["basis"], molar_masses)
            temperature = _number(row["T_K"], path, "T_K")
            value = _number(row["value"], path, "value")
            given = {"T_K": temperature, "fraction_1": listed, "value": value}
            pair = (names[0], names[1] if len(names) == 2 else "")
            found.append(
                Point(
                    file=file,
                    doi=(row.get("doi") or "").strip(),
                    temperature=temperature,
                    fraction=fraction,
                    value=value,
                    excluded=self._reason(file, pair, prop, given),
                )
            )
        return found

    def select(
        self,
        selections: Sequence[Mapping[str, Any]],
        prop: str,
        names: tuple[str, ...],
        molar_masses: tuple[float, float] | None = None,
    ) -> list[Point]:
        """The points that a spec's selections name, each once, excluded ones marked."""
        chosen: dict[tuple[str, str, float, float, float], Point] = {}
        for selection in selections:
            unknown = set(selection) - _SELECTION_KEYS
            if unknown or "file" not in selection:
                raise BuildError(
                    f"selection {dict(selection)} has unknown keys {sorted(unknown)} or no file"
                )
            points = self.read(selection["file"], prop, names, molar_masses)
            points = [point for point in points if _chosen(point, selection)]
            points = points[:: int(selection.get("every", 1))]
            if not points:
                raise BuildError(f"{prop} of {' + '.join(names)}: {dict(selection)} finds no point")
            weight = float(selection.get("weight", 1.0))
            for point in points:
                place = (
                    point.file,
                    point.doi,
                    point.temperature,
                    round(point.fraction, 9),
                    point.value,
                )
                chosen.setdefault(place, replace(point, weight=weight))
        return list(chosen.values())


def _chosen(point: Point, selection: Mapping[str, Any]) -> bool:
    wanted = selection.get("doi")
    unwanted = selection.get("not_doi", [])
    if wanted is not None and point.doi not in ([wanted] if isinstance(wanted, str) else wanted):
        return False
    if point.doi in ([unwanted] if isinstance(unwanted, str) else unwanted):
        return False
    return within(point, selection.get("T", (0.0, math.inf)), selection.get("fraction", (0.0, 1.0)))
