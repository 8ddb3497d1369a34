"""What every record must stand: each check gives a list of what is wrong, empty where all is well.

Mixtures are computed here by the equations of data/README.md, written out once more: the
library's own mixing is not used, so that neither can hide a fault of the other.
"""

from __future__ import annotations

import itertools
import math
import sys
from collections.abc import Callable, Iterator
from functools import cache
from pathlib import Path
from typing import Any

import numpy as np

from dropkit.errors import RecordError
from dropkit.properties.equations import FORMS, evaluate
from dropkit.published_rows import published_file
from dropkit.record_rules import ARCHIVE, independent, problems, publication, second_sources
from dropkit.record_store import Store
from dropkit.record_types import (
    INTERFACIAL,
    PROPERTIES,
    LiquidRecord,
    PairRecord,
    PropertyRecord,
)
from dropkit.unit_table import KINDS, NOMENCLATURE

sys.path.append(str(Path(__file__).resolve().parents[2] / "data" / "build"))
from record_builder.independent import independent_points

GAS_CONSTANT = 8.314462618  # J/(mol K)
ATMOSPHERE = 101325.0  # Pa
WATER_DENSEST = 277.15  # K; below it water expands on cooling
LIQUID_COLUMNS = ["liquid", "property", "T_K", "value", "doi"]
MIXTURE_COLUMNS = [
    *("component_1", "component_2", "basis", "fraction_1"),
    *("T_K", "property", "value", "doi"),
]
INTERFACE_COLUMNS = ["liquid_1", "liquid_2", "T_K", "value", "doi"]
PARTS = {
    "liquids": ("liquid",),
    "mixtures": ("component_1", "component_2"),
    "interfaces": ("liquid_1", "liquid_2"),
}
EXCLUDED_COLUMNS = [
    *("file", "component_1", "component_2", "property", "T_K"),
    *("fraction_1", "value", "reason", "contradicting_source"),
]

# How each property of a pair is mixed; one rule, so that pairs can be added up.
RULES = {
    "density": ("reciprocal", "mass"),
    "viscosity": ("log", "volume"),
    "surface_tension": ("log", "volume"),
    "refractive_index": ("linear", "volume"),
}

Record = LiquidRecord | PairRecord
FOLDERS = ("liquids", "mixtures", "interfaces")


class Folder:
    """A data folder with everything in it."""

    def __init__(self, root: Path) -> None:
        self.root = Path(root)
        self.store = Store(str(root))
        self._rows: dict[str, list[dict[str, Any]]] = {}

    def names(self) -> list[str]:
        """``liquids/...``, ``mixtures/...`` and ``interfaces/...``."""
        return [
            f"{folder}/{stem}" for folder in FOLDERS for stem in sorted(self.store.stems(folder))
        ]

    def published(self) -> list[str]:
        """Published files, as `points` names them."""
        return [
            f"{folder}/{path.stem}"
            for folder in FOLDERS
            for path in sorted((self.root / "published" / folder).glob("*.csv"))
        ]

    def record(self, name: str) -> Record:
        """The record behind a name."""
        folder, stem = name.split("/")
        if folder == "liquids":
            return self.store.liquid(stem)
        find = self.store.pair if folder == "mixtures" else self.store.interface
        pair = find(*stem.split("__"))
        assert pair is not None
        return pair

    def comments(self, name: str) -> list[str]:
        """The leading lines of a published file that begin with '#'."""
        text = (self.root / "published" / f"{name}.csv").read_text(encoding="utf-8")
        return list(itertools.takewhile(lambda line: line.startswith("#"), text.splitlines()))

    def rows(self, name: str) -> list[dict[str, Any]]:
        """The rows of a published file."""
        if name not in self._rows:
            self._rows[name] = published_file(self.root / "published" / f"{name}.csv", name)
        return self._rows[name]


# Values ------------------------------------------------------------------------------------


def widest(block: PropertyRecord) -> tuple[float, float]:
    """The whole range in which a block is ever used."""
    limits = block.mixture_range or block.range
    return limits.low, limits.high


def pure(block: PropertyRecord, T: Any) -> np.ndarray:
    """A block of a pure liquid at temperatures."""
    body = FORMS[block.form].array(block.parameters, label=block.label)
    with np.errstate(all="ignore"):
        return evaluate(body, np.atleast_1d(np.asarray(T, dtype=float)))


def component(liquid: LiquidRecord, name: str, T: np.ndarray) -> np.ndarray:
    """A property of a pure liquid inside a mixture: the first block that holds each T."""
    found = np.full(T.shape, np.nan)
    for block in reversed(liquid.properties.get(name, ())):
        low, high = widest(block)
        held = (low - 1e-9 <= T) & (high + 1e-9 >= T)
        found[held] = pure(block, T[held])
    return found


def mixed(folder: Folder, pair: PairRecord, block: PropertyRecord, w: Any, T: Any) -> np.ndarray:
    """A block of a pair at mass fractions of component 1 and temperatures."""
    w1, T = np.broadcast_arrays(np.asarray(w, dtype=float), np.asarray(T, dtype=float))
    w1, T = np.ravel(w1), np.ravel(T).copy()
    one, two = (folder.store.liquid(key) for key in pair.components)
    p = block.parameters
    with np.errstate(all="ignore"):
        if block.form == "redlich_kister":
            return _redlich_kister(p, block.property, one, two, w1, T)
        return _salt(block, one, two, w1, T)


def _redlich_kister(
    p: Any, name: str, one: LiquidRecord, two: LiquidRecord, w1: np.ndarray, T: np.ndarray
) -> np.ndarray:
    at_20 = np.array([293.15])
    per_mass = {
        "mass": lambda liquid: 1.0,
        "mole": lambda liquid: 1.0 / liquid.molar_mass,
        "volume": lambda liquid: 1.0 / component(liquid, "density", at_20)[0],
    }[p["basis"]]
    part1, part2 = w1 * per_mass(one), (1.0 - w1) * per_mass(two)
    x1 = part1 / (part1 + part2)
    x2 = 1.0 - x1
    there: Callable[[Any], Any]
    back: Callable[[Any], Any]
    there, back = {
        "log": (np.log, np.exp),
        "reciprocal": (np.reciprocal, np.reciprocal),
        "linear": (np.asarray, np.asarray),
    }[p["transform"]]
    y1, y2 = component(one, name, T), component(two, name, T)
    th = (T - 298.15) / 100.0
    excess = sum(
        (x1 - x2) ** k * sum(c * th**j for j, c in enumerate(row))
        for k, row in enumerate(p["coefficients"])
    )
    # A pure end needs no value of the other liquid.
    ends = np.where(x1 > 0, x1 * there(y1), 0.0) + np.where(x2 > 0, x2 * there(y2), 0.0)
    return np.asarray(back(ends + x1 * x2 * excess))


def _salt(
    block: PropertyRecord, one: LiquidRecord, two: LiquidRecord, w1: np.ndarray, T: np.ndarray
) -> np.ndarray:
    """Laliberte 2009, Dutcher 2010, a polynomial; the solute may be either component."""
    p, t = block.parameters, T - 273.15
    solvent, salt, ws = (one, two, 1.0 - w1) if two.kind == "solute" else (two, one, w1)
    y0 = component(solvent, block.property, T)
    if block.form == "solute_polynomial":
        per_mass, of_water = 1.0 / salt.molar_mass, 1.0 / solvent.molar_mass
        x = ws * per_mass / (ws * per_mass + (1.0 - ws) * of_water) if p["basis"] == "mole" else ws
        th = (T - p.get("centre", 298.15)) / p.get("scale", 100.0)
        change = sum(
            x**i * sum(c * th**j for j, c in enumerate(row))
            for i, row in enumerate(p["coefficients"], 1)
        )
        found = {"log": y0 * np.exp(change), "ratio": y0 + y0 * change, "linear": y0 + change}
        return np.asarray(found[p["transform"]])
    # Some apparent values are infinite without salt, where they are weighted with zero.
    empty, ws = ws == 0.0, np.where(ws == 0.0, 1e-12, ws)
    made = _laliberte_or_dutcher(block, salt, solvent, ws, T, t, y0)
    return np.where(empty, y0, made)


def _laliberte_or_dutcher(
    block: PropertyRecord,
    salt: LiquidRecord,
    solvent: LiquidRecord,
    ws: np.ndarray,
    T: np.ndarray,
    t: np.ndarray,
    y0: np.ndarray,
) -> np.ndarray:
    p = block.parameters
    if block.form == "laliberte_density":
        apparent = (
            (p["c0"] * ws + p["c1"])
            * np.exp(1e-6 * (t + p["c4"]) ** 2)
            / (ws + p["c2"] + p["c3"] * t)
        )
        return np.asarray(1.0 / ((1.0 - ws) / y0 + ws / apparent))
    if block.form == "laliberte_viscosity":
        apparent = np.exp((p["v1"] * ws ** p["v2"] + p["v3"]) / (p["v4"] * t + 1.0))
        apparent = 0.001 * apparent / (p["v5"] * ws ** p["v6"] + 1.0)
        return np.asarray(np.exp((1.0 - ws) * np.log(y0) + ws * np.log(apparent)))
    if block.form == "dutcher_surface_tension":
        moles, water = ws / salt.molar_mass, (1.0 - ws) / solvent.molar_mass
        xs = moles / (moles + water)
        xw = 1.0 - xs
        sw, ss = 1000.0 * y0, p["c1"] + p["c2"] * T
        f_ws, f_sw = p["a_ws"] + p["b_ws"] * T, p["a_sw"] + p["b_sw"] * T
        log = xw * np.log(sw + f_ws * xs) + xs * np.log(ss + f_sw * xw)
        return np.asarray(0.001 * np.exp(log))
    raise RecordError(f"{block.label}: form '{block.form}' is not known for a mixture")


def value(folder: Folder, record: Record, block: PropertyRecord, T: Any, w: Any) -> np.ndarray:
    """A block of a liquid, pair or interface; `w` is passed over where there is no composition."""
    if isinstance(record, LiquidRecord) or touching(record):
        return pure(block, T)
    return mixed(folder, record, block, w, T)


def touching(record: Record) -> bool:
    """Whether it is the record of two liquids in contact, a function of temperature alone."""
    return INTERFACIAL in record.properties


def blocks(record: Record) -> Iterator[PropertyRecord]:
    """Every block of a record."""
    return itertools.chain.from_iterable(record.properties.values())


def relative_uncertainty(block: PropertyRecord, at: float) -> float:
    """Standard uncertainty (k = 1) of a block at one of its values."""
    absolute = block.uncertainty_absolute
    return max(block.uncertainty, 0.0 if absolute is None else absolute / abs(at))


def fractions(record: Record, block: PropertyRecord, count: int) -> list[float]:
    """Mass fractions over the range of a pair's block; one entry where there is none."""
    if isinstance(record, LiquidRecord) or touching(record):
        return [math.nan]
    low, high = block.parameters["fraction_range"]
    return [float(w) for w in np.linspace(low, high, count)]


def where(w: float) -> str:
    return "" if math.isnan(w) else f", w = {w:g}"


# Checks of records -------------------------------------------------------------------------


def earned(folder: Folder, name: str, record: Record) -> list[str]:
    """Sources exist, files of points exist, the grade is earned."""
    return problems(folder.store, record)


def archive_papers(folder: Folder, name: str, record: Record) -> list[str]:
    """A fit to the archive alone needs two of its papers to be 'measured'."""
    found = []
    for block in blocks(record):
        groups = independent(folder.store, [*block.sources, *second_sources(block)])
        if block.grade != "measured" or len(groups) > 1:
            continue
        papers = {
            row["doi"]
            for file in block.points
            if publication(file.split("/")[1]) == ARCHIVE
            for row in rows_of(folder, file, record, block.property)
            if row["doi"]
        }
        if len(papers) < 2:
            found.append(f"{block.label}: 'measured' on {len(papers)} paper of the archive")
    return found


def rows_of(folder: Folder, file: str, record: Record, name: str) -> list[dict[str, Any]]:
    """Rows of a published file that belong to a record and property."""
    if isinstance(record, LiquidRecord):
        wanted = {"liquid": record.key, "property": name}
    elif touching(record):
        wanted = dict(zip(INTERFACE_COLUMNS, record.components, strict=False))
    else:
        one, two = record.components
        wanted = {"component_1": one, "component_2": two, "property": name}
    return [row for row in folder.rows(file) if wanted.items() <= row.items()]


def points(folder: Folder, name: str, record: Record) -> list[str]:
    """Each file of points holds points of that record."""
    return [
        f"{block.label}: {file} holds no such points"
        for block in blocks(record)
        for file in block.points
        if not rows_of(folder, file, record, block.property)
    ]


def equations(folder: Folder, name: str, record: Record) -> list[str]:
    """The form is known and has its parameters."""
    found = []
    for block in blocks(record):
        try:
            low, high = widest(block)
            value(folder, record, block, [low, high], fractions(record, block, 2))
            if isinstance(record, LiquidRecord) or touching(record):
                FORMS[block.form].scalar(block.parameters, label=block.label)
            elif block.form == "redlich_kister":
                rule = (block.parameters["transform"], block.parameters["basis"])
                if rule != RULES[block.property]:
                    found.append(f"{block.label}: mixes by {rule[0]} on {rule[1]}")
        except RecordError as error:
            found.append(str(error))
        except KeyError as error:
            found.append(f"{block.label}: parameter {error} is missing")
    return found


def check_points(folder: Folder, name: str, record: Record) -> list[str]:
    """The equation gives every check point within its tolerance."""
    found = []
    for block in blocks(record):
        for check in block.checks:
            got = value(folder, record, block, check["T"], check.get("fraction", math.nan))[0]
            off = abs(got / check["value"] - 1.0)
            if not off <= check["tolerance"]:
                found.append(
                    f"{block.label}: {got:.6g} at {check['T']:g} K, {check['source']} has "
                    f"{check['value']:.6g}: {off:.2%} off, allowed {check['tolerance']:.2%}"
                )
    return found


def tolerances(folder: Folder, name: str, record: Record) -> list[str]:
    """No check is laxer than what the record says of itself: two standard uncertainties."""
    found = []
    for block in blocks(record):
        for check in block.checks:
            allowed = 2.0 * relative_uncertainty(block, check["value"])
            if check["tolerance"] > 1.01 * allowed:  # the builder rounds upwards
                found.append(
                    f"{block.label}: check at {check['T']:g} K has the tolerance "
                    f"{check['tolerance']:.2%}, twice the uncertainty is {allowed:.2%}"
                )
    return found


@cache
def _independent(root: Path, name: str) -> dict[tuple[str, int], list[tuple[float, float, float]]]:
    """Temperatures, fractions and values of the second sources' points, by property and block."""
    return {
        (prop, number): [(p.temperature, p.fraction, p.value) for p in found]
        for prop, number, found in independent_points(name, root)
    }


def held(folder: Folder, record: Record, block: PropertyRecord) -> tuple[float, int]:
    """Share of a block's independent points within two standard uncertainties, and their number.

    The points are those that the builder compared it with, found anew from the spec.
    """
    kind, _, stem = block.label.partition(":")[0].partition("/")
    name = f"{kind}/{stem}" if kind == "interfaces" else stem
    number = int(block.label.rpartition(" ")[2])
    inside = []
    for T, fraction, published in _independent(folder.root, name).get((block.property, number), []):
        w = None if math.isnan(fraction) else fraction
        got = float(value(folder, record, block, T, w)[0])
        u = relative_uncertainty(block, published)
        inside.append(abs(got / published - 1.0) <= 2.001 * u)
    return (float(np.mean(inside)) if inside else 1.0), len(inside)


def sane(folder: Folder, name: str, record: Record) -> list[str]:
    """Finite and positive over the whole range, ends included, and of a plausible size."""
    found = []
    for block in blocks(record):
        T = np.linspace(*widest(block), 401)
        kind = KINDS[NOMENCLATURE.get(block.property, block.property)]
        low, high = kind.plausible or (0.0, math.inf)
        for w in fractions(record, block, 21):
            got = value(folder, record, block, T, w)
            if not (np.isfinite(got) & (got > 0)).all():
                at = T[~(np.isfinite(got) & (got > 0))]
                found.append(f"{block.label}: no value above zero at {at[0]:g} K{where(w)}")
                break
            # An extension for mixtures may be beyond what a liquid of its own would have.
            got = got[block.range.holds(T)]
            if got.min() < low or got.max() > high:
                found.append(
                    f"{block.label}: runs from {got.min():.3g} to {got.max():.3g}{where(w)}, "
                    f"which no liquid does ({low:g} to {high:g})"
                )
                break
    return found


def ends(folder: Folder, name: str, record: Record) -> list[str]:
    """Scalar and array body give the same at both ends of every range."""
    if isinstance(record, PairRecord) and not touching(record):
        return []
    found = []
    for block in blocks(record):
        scalar = FORMS[block.form].scalar(block.parameters)
        for T in {block.range.low, block.range.high, *widest(block)}:
            one, other = scalar(T), float(pure(block, T)[0])
            if not abs(one - other) <= 1e-12 * abs(one):
                found.append(f"{block.label}: {one!r} and {other!r} at {T:g} K")
    return found


def _holds_fraction(block: PropertyRecord, w: float) -> bool:
    """Whether a block of a pair serves a mass fraction."""
    low, high = block.parameters.get("fraction_range", (0.0, 1.0))
    return bool(low <= w <= high)


def joins(folder: Folder, name: str, record: Record) -> list[str]:
    """Blocks of one property step by less than their combined uncertainty (95 %)."""
    found = []
    for several in record.properties.values():
        for first, second in itertools.combinations(several, 2):
            for T in (first.range.low, first.range.high):
                if not second.range.holds(T):
                    continue
                for w in fractions(record, first, 5):
                    if not math.isnan(w) and not _holds_fraction(second, w):
                        continue
                    a = value(folder, record, first, T, w)[0]
                    b = value(folder, record, second, T, w)[0]
                    allowed = 2.0 * math.hypot(
                        relative_uncertainty(first, a), relative_uncertainty(second, b)
                    )
                    if not abs(a / b - 1.0) <= allowed:
                        found.append(
                            f"{first.label} and {second.label} differ by {abs(a / b - 1):.2%} at "
                            f"{T:g} K{where(w)}, allowed {allowed:.2%}"
                        )
    return found


def slopes(folder: Folder, name: str, record: Record) -> list[str]:
    """What falls with temperature falls, and vapour pressure rises."""
    found = []
    for block in blocks(record):
        direction = {
            "viscosity": -1,
            "density": -1,
            "vapour_pressure": +1,
            "surface_tension": -1,
            "heat_of_vaporisation": -1,
        }.get(block.property)
        if direction is None or block.form == "constant" or "reason" in block.reasons:
            continue
        low, high = widest(block)
        if block.property == "density" and "water" in name.split("/")[1].split("__"):
            # Water's own maximum; a block that ends below it holds no water-rich mixture.
            low = WATER_DENSEST if low < WATER_DENSEST < high else low
        T = np.linspace(low, high, 401)
        for w in fractions(record, block, 21):
            steps = np.diff(value(folder, record, block, T, w)) * direction
            # Surface tension may stay where it is, the others may not.
            wrong = steps < 0 if block.property == "surface_tension" else steps <= 0
            if wrong.any():
                way = "falls" if direction > 0 else "rises"
                found.append(f"{block.label}: {way} at {T[:-1][wrong][0]:g} K{where(w)}")
                break
    return found


def temperatures(folder: Folder, name: str, record: Record) -> list[str]:
    """No range passes the critical point; the components cover the range of their pair."""
    found = []
    for block in blocks(record):
        if isinstance(record, LiquidRecord):
            critical = record.critical_temperature
            if critical is not None and widest(block)[1] > critical:
                found.append(f"{block.label}: range passes the critical point, {critical:g} K")
            continue
        if touching(record):
            continue
        low, high = block.range.low, block.range.high
        for key in record.components:
            liquid = folder.store.liquid(key)
            if liquid.kind == "solute":
                continue
            covered = component(liquid, block.property, np.linspace(low, high, 201))
            if np.isnan(covered).any():
                found.append(f"{block.label}: {key} has no {block.property} over all of its range")
    return found


def left_out(folder: Folder, name: str, record: Record) -> list[str]:
    """A fit says how well it does on data that it did not see; one value has none to leave out."""
    return [
        f"{block.label}: fitted, but without left_out"
        for block in blocks(record)
        if "fitted here" in block.obtained
        and block.form != "constant"
        and block.left_out is None
        and block.second is None
    ]


def boils(folder: Folder, name: str, record: Record) -> list[str]:
    """Vapour pressure at the boiling point is one atmosphere, to 3 % and its uncertainty.

    A boiling point half a kelvin off makes 1.7 %.
    """
    if isinstance(record, PairRecord) or record.boiling_point is None:
        return []
    for block in record.properties.get("vapour_pressure", ()):
        if block.range.holds(record.boiling_point):
            got = pure(block, record.boiling_point)[0]
            allowed = 0.03 + 2.0 * relative_uncertainty(block, got)
            if not abs(got / ATMOSPHERE - 1.0) <= allowed:
                return [
                    f"{block.label}: {got:.6g} Pa at the boiling point, "
                    f"{got / ATMOSPHERE - 1:.1%} off"
                ]
            break
    return []


def clausius_clapeyron(folder: Folder, name: str, record: Record) -> list[str]:
    """Heat of vaporisation and the slope of the vapour pressure agree at low pressure.

    L = R T^2 / M dln(p)/dT holds to 2 % for a vapour below a fifth of an atmosphere; 6 % and
    the heat's own uncertainty are allowed, for slopes are hard to measure.
    """
    if isinstance(record, PairRecord):
        return []
    found = []
    for pressure in record.properties.get("vapour_pressure", ())[:1]:
        for heat in record.properties.get("heat_of_vaporisation", ())[:1]:
            low = max(pressure.range.low, heat.range.low) + 0.5
            high = min(pressure.range.high, heat.range.high) - 0.5
            if low >= high:
                continue
            T = np.linspace(low, high, 41)
            p = pure(pressure, T)
            T = T[(p > 1.0) & (p < 0.2 * ATMOSPHERE)]
            slope = np.log(pure(pressure, T + 0.5) / pure(pressure, T - 0.5))
            expected = GAS_CONSTANT * T**2 / record.molar_mass * slope
            off = pure(heat, T) / expected - 1.0
            allowed = 0.06 + 2.0 * heat.uncertainty
            if (abs(off) > allowed).any():
                worst = int(np.argmax(abs(off)))
                found.append(
                    f"{heat.label} and {pressure.label}: {off[worst]:.1%} apart at "
                    f"{T[worst]:.1f} K (Clausius-Clapeyron), allowed {allowed:.1%}"
                )
    return found


RECORD_CHECKS: list[Callable[[Folder, str, Record], list[str]]] = [
    earned,
    archive_papers,
    points,
    equations,
    check_points,
    tolerances,
    sane,
    ends,
    joins,
    slopes,
    temperatures,
    left_out,
    boils,
    clausius_clapeyron,
]


# Checks of published points ----------------------------------------------------------------


def published(folder: Folder, name: str) -> list[str]:
    """Header, columns, known components and properties, values in SI of a plausible size."""
    kind, stem = name.split("/")
    found = []
    heads = [line.split(":")[0] for line in folder.comments(name)]
    for wanted in ("# source", "# seen", "# uncertainty"):
        if wanted not in heads:
            found.append(f"published/{name}: no line '{wanted}:'")
    if stem not in folder.store.stems("sources") and (
        publication(stem) not in folder.store.stems("sources")
    ):
        found.append(f"published/{name}: there is no source {publication(stem)}")
    rows = folder.rows(name)
    columns = dict(zip(FOLDERS, (LIQUID_COLUMNS, MIXTURE_COLUMNS, INTERFACE_COLUMNS), strict=True))[
        kind
    ]
    if not rows or list(rows[0]) != columns:
        return [*found, f"published/{name}: needs rows with the columns {','.join(columns)}"]
    for number, row in enumerate(rows, 1):
        found.extend(
            f"published/{name}, row {number}: {problem}" for problem in _row(folder, row, kind)
        )
    return found


def _row(folder: Folder, row: dict[str, Any], kind: str) -> Iterator[str]:
    if None in row or None in row.values():
        yield "has another number of fields than the header"
        return
    parts = [row[name] for name in PARTS[kind]]
    # The columns of an interface name its property; its liquids may still have to be built.
    row = row if "property" in row else {**row, "property": INTERFACIAL}
    planned = folder.root / "build" / "specs" / "interfaces" / f"{'__'.join(parts)}.toml"
    for key in parts:
        if key not in folder.store.stems("liquids") and not planned.is_file():
            yield f"there is no liquid '{key}'"
    if parts != sorted(parts):
        yield "components are not in alphabetical order"
    if row["property"] not in (*PROPERTIES, INTERFACIAL):
        yield f"property '{row['property']}' is not known"
        return
    if row["doi"].casefold().startswith(("doi", "http")):
        yield f"'{row['doi']}' is no bare DOI"
    unit = KINDS[NOMENCLATURE.get(row["property"], row["property"])]
    low, high = unit.plausible or (0.0, math.inf)
    limits = {"T_K": (150.0, 2500.0), "value": (low, high)}
    if kind == "mixtures":
        limits["fraction_1"] = (0.0, 1.0)
        if row["basis"] not in ("mass", "mole"):
            yield f"basis '{row['basis']}' is not mass or mole"
    for column, (least, most) in limits.items():
        try:
            number = float(row[column])
        except ValueError:
            number = math.nan
        if not least <= number <= most:
            yield f"{column} is '{row[column]}', expected {least:g} to {most:g}"


def excluded(folder: Folder) -> list[str]:
    """Each excluded row means published rows, with a reason and what contradicts them."""
    path = folder.root / "published" / "excluded.csv"
    if not path.is_file():
        return []
    rows = published_file(path)
    if rows and list(rows[0]) != EXCLUDED_COLUMNS:
        return [f"published/excluded.csv: needs the columns {','.join(EXCLUDED_COLUMNS)}"]
    found = []
    cache: dict[str, list[dict[str, Any]]] = {}
    for number, row in enumerate(rows, 1):
        label = f"published/excluded.csv, row {number}"
        if not row["reason"] or not row["contradicting_source"]:
            found.append(f"{label}: needs a reason and a contradicting source")
        if row["file"] not in folder.published():
            found.append(f"{label}: there is no published/{row['file']}.csv")
            continue
        candidates = cache.setdefault(row["file"], folder.rows(row["file"]))
        if not any(_same(row, candidate) for candidate in candidates):
            found.append(f"{label}: no such row in published/{row['file']}.csv")
    return found


def _same(row: dict[str, Any], candidate: dict[str, Any]) -> bool:
    """Whether an exclusion means a published row; a number left blank means every one."""
    keys = {"property": "property", "component_1": "component_1", "component_2": "component_2"}
    numbers = ["T_K", "value", "fraction_1"]
    if "liquid" in candidate:
        if row["component_2"] or row["fraction_1"]:
            return False
        keys = {"property": "property", "component_1": "liquid"}
        numbers = numbers[:2]
    if "liquid_1" in candidate:
        if row["property"] != INTERFACIAL or row["fraction_1"]:
            return False
        keys, numbers = {"component_1": "liquid_1", "component_2": "liquid_2"}, numbers[:2]
    return all(row[mine] == candidate[theirs] for mine, theirs in keys.items()) and all(
        math.isclose(float(row[column]), float(candidate[column]), rel_tol=1e-9)
        for column in numbers
        if row[column]
    )
