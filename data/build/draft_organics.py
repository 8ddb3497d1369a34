"""First drafts of specs for the organic liquids, to be read and mended by hand.

    python data/build/draft_organics.py FOLDER [key ...]

For each liquid of `organics.csv` and each property the rules below list candidate blocks in order
of preference; the first that the builder accepts as measured (or reference) is written, else the
first that stands as single, with what spoke against it. An existing spec is never overwritten.
FOLDER holds the reference tables (for flash points). A draft is where the judging begins.
"""

from __future__ import annotations

import json
import math
import sys
from collections.abc import Iterable, Iterator
from pathlib import Path
from typing import Any

import numpy as np
from convert_organics import (
    CAS,
    SUBJECTS,
    identifiers,
    melting_point,
    numbers,
    reference,
    table,
    table_csv,
)
from formulation_sources import FORMULATIONS
from record_builder import BuildError
from record_builder.blocks import build_block
from record_builder.points import Point, Published
from record_builder.subjects import Liquid

HERE = Path(__file__).resolve().parent
DATA = HERE.parent
PUBLISHED = Published(DATA / "published")
Block = dict[str, Any]
EQUATION = "equation"


def organics(source: str) -> str:
    return f"liquids/{source}_organics"


def points(source: str, key: str, prop: str) -> list[Point]:
    path = DATA / "published" / f"{organics(source)}.csv"
    if not path.exists():
        return []
    return [p for p in PUBLISHED.read(organics(source), prop, (key,)) if not p.excluded]


def only(found: Iterable[Point], doi: str) -> list[Point]:
    return [p for p in found if p.doi == doi]


def span(found: Iterable[Point]) -> tuple[float, float]:
    T = [p.temperature for p in found]
    return min(T), max(T)


def selection(source: str, **more: Any) -> Block:
    return {"file": organics(source), **more}


def lowest(key: str) -> float:
    return max(253.15, math.ceil(melting_point(key) * 10) / 10)


def trimmed(key: str, low: float, high: float) -> list[float]:
    return [round(max(low, lowest(key)), 2), round(high, 2)]


def density(key: str) -> Iterator[Block]:
    papers = points("ThermoMLArchive", key, "density")
    vdi = only(points("VDIHeatAtlas2010", key, "density"), EQUATION)
    perry = points("PerryGreen2008", key, "density")
    spots = points("CRCHandbook2014", key, "density")
    handbooks = [
        selection(name, doi=EQUATION)
        for name, found in (("VDIHeatAtlas2010", vdi), ("PerryGreen2008", perry))
        if found
    ]
    spot = [selection("CRCHandbook2014")] if spots else []
    if CAS[key] in FORMULATIONS and papers:
        f = FORMULATIONS[CAS[key]]
        ends = trimmed(key, 253.15, f.high)
        yield {
            "form": "polynomial", "degree": 4, "range": ends,
            "formulation": f.density_words,
            "sample": {"engine": "CoolProp", "fluid": f.fluid, "T": ends, "points": 41},
            "second": [selection("ThermoMLArchive")], "sources": [f.density],
            "grade": "reference", "source_uncertainty": 0.0005, "place": "saturated liquid",
        }  # fmt: skip
    if papers:
        low, high = span(papers)
        wide = high - low >= 20
        fit = [selection("ThermoMLArchive")]
        several = len({p.source for p in papers}) > 1
        base: Block = {
            "form": "polynomial", "degree": 2 if high - low > 35 else 1, "robust": "huber",
            "place": "papers in the archive, doi per point", "source_uncertainty": 0.0005,
        }  # fmt: skip
        # handbook equations carry the slope beyond the papers, where they agree on the level
        reach = 8.0 if wide else 3.0
        for name, found in (("VDIHeatAtlas2010", vdi), ("PerryGreen2008", perry)):
            found = only(found, EQUATION)
            if len(found) < 3:
                continue
            T = np.array([p.temperature for p in found])
            values = np.array([p.value for p in found])
            line = np.poly1d(np.polyfit(T, values, min(3, len(found) - 1)))
            off = np.median([line(p.temperature) / p.value - 1 for p in papers])
            if abs(off) > 0.0015:
                continue
            extra = []
            if T.min() < low - reach:
                extra.append(selection(name, doi=EQUATION, T=[250.0, low - reach]))
            if T.max() > high + reach:
                extra.append(selection(name, doi=EQUATION, T=[high + reach, 420.0]))
            if extra:
                ends = trimmed(key, min(low, T.min()), max(high, T.max()))
                yield base | {
                    "degree": 3 if ends[1] - ends[0] > 120 else 2, "range": ends,
                    "fit": fit + extra, "balance": True,
                    "place": "papers in the archive, doi per point; handbook equation beyond them",
                }  # fmt: skip
        if wide:
            ends = trimmed(key, low, high)
            if several:
                yield base | {"range": ends, "fit": fit}
            for second in (spot, handbooks[:1], handbooks[1:]):
                if second:
                    yield base | {"range": ends, "fit": fit, "second": second}
            yield base | {"range": ends, "fit": fit}
    fitted = points("BellThermo2023", key, "density")
    if len(fitted) >= 3:
        base = {
            "form": "polynomial", "degree": 2, "range": trimmed(key, *span(fitted)),
            "fit": [selection("BellThermo2023")], "left_out": "every fifth",
            "place": "correlation of the library", "source_uncertainty": 0.001,
        }  # fmt: skip
        if papers:
            yield base | {"second": [selection("ThermoMLArchive")]}
        yield base
    for first, others in ((vdi, perry), (perry, vdi)):
        if not first:
            continue
        name = "VDIHeatAtlas2010" if first is vdi else "PerryGreen2008"
        other = "PerryGreen2008" if first is vdi else "VDIHeatAtlas2010"
        low, high = span(first)
        base = {
            "form": "polynomial", "degree": 3 if high - low > 100 else 2,
            "range": trimmed(key, low, high), "fit": [selection(name, doi=EQUATION)],
            "left_out": "every fifth", "place": "equation of the handbook",
            "source_uncertainty": 0.001,
        }  # fmt: skip
        paper = [selection("ThermoMLArchive")] if papers else []
        for second in (paper, spot, [selection(other, doi=EQUATION)] if others else []):
            if second:
                yield base | {"second": second}
        yield base


def viscosity(key: str) -> Iterator[Block]:
    papers = points("ThermoMLArchive", key, "viscosity")
    book = points("Viswanath2007", key, "viscosity")
    vdi = only(points("VDIHeatAtlas2010", key, "viscosity"), EQUATION)
    perry = points("PerryGreen2008", key, "viscosity")
    tabled = only(points("VDIHeatAtlas2010", key, "viscosity"), "table")
    f = FORMULATIONS.get(CAS[key])
    if f is not None and f.viscosity:
        second = [
            selection(name, **more)
            for name, found, more in (
                ("ThermoMLArchive", papers, {}), ("Viswanath2007", book, {}),
                ("VDIHeatAtlas2010", tabled, {"doi": "table"}),
            )
            if found
        ]  # fmt: skip
        ends = trimmed(key, 253.15, f.high)
        yield {
            "form": "exp_polynomial", "variable": "1/T", "degree": 4, "range": ends,
            "formulation": f.viscosity_words,
            "sample": {"engine": "CoolProp", "fluid": f.fluid, "T": ends, "points": 41},
            "second": second, "sources": [f.viscosity], "grade": "reference",
            "source_uncertainty": 0.0175, "place": "saturated liquid",
            "source_uncertainty_reason": "from the scatter of measured points; the stated figure "
            "of the paper was not seen",
        }  # fmt: skip
    # A source that stands off the crowd of papers near room temperature is left out.
    near = [p.value for p in papers if 297 < p.temperature < 299]
    level = float(np.median(near)) if len(near) >= 3 else None
    usable = []
    for name, found, more in (
        ("Viswanath2007", book, {}),
        ("VDIHeatAtlas2010", vdi, {"doi": EQUATION}),
        ("PerryGreen2008", perry, {"doi": EQUATION}),
        ("BellThermo2023", points("BellThermo2023", key, "viscosity"), {}),
        ("Lemmon2018", points("Lemmon2018", key, "viscosity"), {}),
        (
            # Some of its rows are corrupt: of use only where the others are few.
            "ViswanathNatarajan1989",
            [] if book or (vdi and perry) else points("ViswanathNatarajan1989", key, "viscosity"),
            {},
        ),
    ):
        if len(found) < 3:
            continue
        T = np.array([p.temperature for p in found])
        order = np.argsort(T)
        logs = np.log([p.value for p in found])
        if level is not None and T.min() < 299 and T.max() > 297:
            degree = min(3, len(found) - 1)
            at = math.exp(np.poly1d(np.polyfit(1 / T[order], logs[order], degree))(1 / 298.15))
            if abs(at / level - 1) > 0.035:
                continue
        usable.append((name, found, more))
    last = range(len(usable) - 1, -1, -1)
    sets = [usable, *([usable[i] for i in range(len(usable)) if i != j] for j in last), []]
    for chosen in sets:
        everything = [p for _, found, _ in chosen for p in found] + papers
        if not everything or (not chosen and len({round(p.temperature) for p in papers}) < 2):
            continue
        ends = trimmed(key, *span(everything))
        ends[1] = min(ends[1], 413.15)
        if ends[1] - ends[0] < 4:
            continue
        fit = [selection(name, **more) for name, _, more in chosen]
        if papers:
            fit.insert(0, selection("ThermoMLArchive"))
        yield {
            "form": "exp_polynomial", "variable": "1/T", "degree": order_for(ends),
            "range": ends, "fit": fit, "balance": True, "robust": "huber",
            "place": "papers in the archive, doi per point; tables and equations of handbooks",
            "source_uncertainty": 0.015,
        }  # fmt: skip


def order_for(ends: list[float]) -> int:
    width = ends[1] - ends[0]
    return 3 if width > 100 else 2 if width > 25 else 1


def surface_tension(key: str) -> Iterator[Block]:
    line = points("Jasper1972", key, "surface_tension")
    vdi = only(points("VDIHeatAtlas2010", key, "surface_tension"), EQUATION)
    mulero = points("Mulero2012", key, "surface_tension")
    adamson = points("AdamsonGast1997", key, "surface_tension")
    papers = points("ThermoMLArchive", key, "surface_tension")
    data = points("SchmeddingZuend", key, "surface_tension")
    named = {
        "Jasper1972": (line, {}), "Mulero2012": (mulero, {}),
        "VDIHeatAtlas2010": (vdi, {"doi": EQUATION}), "AdamsonGast1997": (adamson, {}),
        "ThermoMLArchive": (papers, {}), "SchmeddingZuend": (data, {}),
        "BellThermo2023": (points("BellThermo2023", key, "surface_tension"), {}),
        "Lemmon2018": (points("Lemmon2018", key, "surface_tension"), {}),
    }  # fmt: skip
    Tc = critical(key)
    plans = [
        (["ThermoMLArchive"], ["Jasper1972"]),
        (["Jasper1972", "Mulero2012"], ["VDIHeatAtlas2010"]),
        (["Jasper1972"], ["Mulero2012"]),
        (["Jasper1972", "VDIHeatAtlas2010"], ["BellThermo2023"]),
        (["Jasper1972"], ["BellThermo2023"]),
        (["BellThermo2023"], ["VDIHeatAtlas2010"]),
        (["SchmeddingZuend"], ["BellThermo2023"]),
        (["Jasper1972"], ["Lemmon2018"]),
        (["Lemmon2018"], ["VDIHeatAtlas2010"]),
        (["SchmeddingZuend"], ["Lemmon2018"]),
        (["Jasper1972", "VDIHeatAtlas2010"], ["AdamsonGast1997"]),
        (["Jasper1972"], ["VDIHeatAtlas2010"]),
        (["Jasper1972"], ["AdamsonGast1997"]),
        (["Mulero2012"], ["VDIHeatAtlas2010"]),
        (["SchmeddingZuend"], ["VDIHeatAtlas2010"]),
        (["SchmeddingZuend"], ["AdamsonGast1997"]),
        (["Jasper1972"], []),
        (["ThermoMLArchive"], []),
        (["Lemmon2018"], []),
        (["BellThermo2023"], []),
        (["SchmeddingZuend"], []),
        (["VDIHeatAtlas2010"], []),
    ]
    for fitted, checking in plans:
        if not all(named[name][0] for name in (*fitted, *checking)):
            continue
        mine = [p for name in fitted for p in named[name][0]]
        low, high = span(mine)
        if high - low < 8:
            continue
        ends = trimmed(key, low, high)
        form: Block = {"form": "polynomial", "degree": 1}
        if Tc is not None and ends[1] - ends[0] > 60:
            form = {"form": "guggenheim", "critical_temperature": Tc}
        block = form | {
            "range": ends, "fit": [selection(n, **named[n][1]) for n in fitted],
            "place": "line, equation or table of the source", "source_uncertainty": 0.008,
        }  # fmt: skip
        if checking:
            block["second"] = [selection(n, **named[n][1]) for n in checking]
        yield block


def critical(key: str) -> float | None:
    row = table("Critical Properties", "CRCCriticalOrganics.tsv").get(CAS[key])
    if row:
        return float(row["Tc"])
    row = table("Interface", "VDI PPDS surface tensions.tsv").get(CAS[key])
    return float(row["Tc"]) if row else None


def vapour_pressure(key: str) -> Iterator[Block]:
    cas = CAS[key]
    known = {
        name: points(name, key, "vapour_pressure")
        for name in ("McGarry1983", "PerryGreen2008", "VDIHeatAtlas2010", "Poling2001")
    }
    seconds = {name: selection(name, doi=EQUATION) for name, found in known.items() if found}
    row = table("Vapor Pressure", "Wagner Original McGarry.tsv").get(cas)
    if row:
        Tc = float(row["Tc"])
        low = max(float(row["Tmin"]), lowest(key))
        block = {
            "form": "wagner",
            "published": {
                "coefficients": numbers(row, "ABCD"), "exponents": [1.0, 1.5, 3.0, 6.0],
                "critical_temperature": Tc, "critical_pressure": float(row["Pc"]),
            },
            "range": [round(low, 2), round(min(Tc - 50, 413.15), 2)], "sources": ["McGarry1983"],
            "place": "Wagner constants", "source_uncertainty": 0.01,
        }  # fmt: skip
        others = [s for name, s in seconds.items() if name != "McGarry1983"]
        if others:
            yield block | {"second": others}
    file = "Table 2-8 Vapor Pressure of Inorganic and Organic Liquids.tsv"
    row = table("Vapor Pressure", file).get(cas)
    if row:
        c = numbers(row, ("C1", "C2", "C3", "C4", "C5"))
        low = max(float(row["Tmin"]), lowest(key))
        block = {
            "form": "dippr101", "published": {"coefficients": c[:4], "exponent": c[4]},
            "range": [round(low, 2), round(min(float(row["Tmax"]) - 30, 413.15), 2)],
            "sources": ["PerryGreen2008"], "place": "table 2-8", "source_uncertainty": 0.015,
        }  # fmt: skip
        for names in (("VDIHeatAtlas2010", "Poling2001"), ("Poling2001",), ("VDIHeatAtlas2010",)):
            if all(n in seconds for n in names):
                yield block | {"second": [seconds[n] for n in names]}
    for first in ("PerryGreen2008", "VDIHeatAtlas2010", "Poling2001"):
        found = only(known[first], EQUATION)
        if len(found) < 4:
            continue
        block = {
            "form": "exp_polynomial", "variable": "1/T", "degree": 2,
            "range": trimmed(key, *span(found)), "fit": [seconds[first]],
            "left_out": "every fifth", "place": "equation of the handbook",
            "source_uncertainty": 0.02,
        }  # fmt: skip
        others = [s for name, s in seconds.items() if name != first]
        if others:
            yield block | {"second": others}
        yield block


def heat_of_vaporisation(key: str) -> Iterator[Block]:
    cas = CAS[key]
    vdi = only(points("VDIHeatAtlas2010", key, "heat_of_vaporisation"), EQUATION)
    crc = points("CRCHandbook2014", key, "heat_of_vaporisation")
    second = [selection("CRCHandbook2014")] if crc else []
    if vdi:
        second.append(selection("VDIHeatAtlas2010", doi=EQUATION))
    file = "Table 2-150 Heats of Vaporization of Inorganic and Organic Liquids.tsv"
    row = table("Phase Change", file).get(cas)
    if row:
        Tc = float(row["Tc"])
        a, *more = numbers(row, ("C1", "C2", "C3", "C4"))
        while len(more) > 1 and more[-1] == 0.0:
            more.pop()
        m = float(identifiers()[cas][1])
        block = {
            "form": "watson",
            "published": {
                "coefficients": [float(f"{a / m * 1000:.9g}"), *more], "critical_temperature": Tc,
            },
            "range": trimmed(key, float(row["Tmin"]), min(413.15, Tc - 60)),
            "sources": ["PerryGreen2008"], "place": "table 2-150, divided by the molar mass",
            "source_uncertainty": 0.015,
        }  # fmt: skip
        for chosen in (second, second[:1], second[1:]):
            if chosen:
                yield block | {"second": chosen}
    if len(vdi) >= 4:
        low, high = span(vdi)
        block = {
            "form": "polynomial", "degree": 2, "range": trimmed(key, low, high),
            "fit": [selection("VDIHeatAtlas2010", doi=EQUATION)], "left_out": "every fifth",
            "place": "PPDS equation", "source_uncertainty": 0.02,
        }  # fmt: skip
        if crc:
            yield block | {"second": [selection("CRCHandbook2014")]}
        yield block
    if crc:
        yield spot_block(key, "heat_of_vaporisation", crc[0], 0.02, 5.0, "CRCHandbook2014",
                         "table Enthalpy of Vaporization, divided by the molar mass")  # fmt: skip


def spot_block(
    key: str, prop: str, point: Point, u: float, half: float, source: str, place: str
) -> Block:
    return {
        "form": "constant", "published": {"value": point.value},
        "range": [round(point.temperature - half, 2), round(point.temperature + half, 2)],
        "sources": [source], "place": place, "source_uncertainty": u, "single": True,
        "single_reason": f"one printed value; held over {half:g} K either side, which the "
        "uncertainty covers",
        "checks": [{
            "T": point.temperature, "value": point.value, "source": source, "place": place,
            "tolerance": 0.001,
        }],
    }  # fmt: skip


def heat_capacity(key: str) -> Iterator[Block]:
    review = points("Zabransky1996", key, "heat_capacity")
    perry = points("PerryGreen2008", key, "heat_capacity")
    crc = points("CRCHandbook2014", key, "heat_capacity")
    second = [selection("PerryGreen2008")] if perry else []
    if crc:
        second.append(selection("CRCHandbook2014"))
    for name, found, seconds in (
        ("Zabransky1996", review, second),
        ("PerryGreen2008", perry, [selection("CRCHandbook2014")] if crc else []),
    ):
        if len(found) < 3:
            continue
        low, high = span(found)
        block = {
            "form": "polynomial", "degree": 2 if len(found) > 3 else 1,
            "range": trimmed(key, low, high), "fit": [selection(name)],
            "left_out": "every fifth", "place": "equation of the source",
            "source_uncertainty": 0.01,
        }  # fmt: skip
        for chosen in (seconds, seconds[-1:], seconds[:1]):
            if chosen:
                yield block | {"second": chosen}
        yield block
    if crc:
        yield spot_block(key, "heat_capacity", crc[0], 0.02, 10.0, "CRCHandbook2014",
                         "table Standard Thermodynamic Properties, divided by the molar mass")  # fmt: skip


def thermal_conductivity(key: str) -> Iterator[Block]:
    perry = points("PerryGreen2008", key, "thermal_conductivity")
    vdi = points("VDIHeatAtlas2010", key, "thermal_conductivity")
    for name, found, other, others in (
        ("PerryGreen2008", perry, "VDIHeatAtlas2010", vdi),
        ("VDIHeatAtlas2010", vdi, "PerryGreen2008", perry),
    ):
        if len(found) < 3:
            continue
        block = {
            "form": "polynomial", "degree": 1 if name == "PerryGreen2008" else 2,
            "range": trimmed(key, *span(found)), "fit": [selection(name)],
            "left_out": "every fifth", "place": "equation of the handbook",
            "source_uncertainty": 0.03,
        }  # fmt: skip
        if len(others) >= 3:
            a = {p.temperature: p.value for p in found}
            b = {p.temperature: p.value for p in others}
            common = sorted(set(a) & set(b))
            same = common and max(abs(a[T] / b[T] - 1) for T in common) < 0.002
            if not same:
                yield block | {"second": [selection(other)]}
            else:
                if points("BellThermo2023", key, "thermal_conductivity"):
                    yield block | {"second": [selection("BellThermo2023")]}
                yield block | {
                    "single": True,
                    "single_reason": "the equations of the two handbooks are equal and count once",
                }
        elif points("BellThermo2023", key, "thermal_conductivity"):
            yield block | {"second": [selection("BellThermo2023")]}
        yield block
    fitted = points("BellThermo2023", key, "thermal_conductivity")
    if len(fitted) >= 3 and not perry and not vdi:
        yield {
            "form": "polynomial", "degree": 1, "range": trimmed(key, *span(fitted)),
            "fit": [selection("BellThermo2023")], "left_out": "every fifth",
            "place": "correlation of the library", "source_uncertainty": 0.03,
        }  # fmt: skip


def static_permittivity(key: str) -> Iterator[Block]:
    row = table("Electrolytes", "Permittivity (Dielectric Constant) of Liquids.tsv").get(CAS[key])
    if not row:
        return
    T, value = float(row["T"]), float(row["Permittivity"])
    place = "table Permittivity of Liquids"
    papers = points("ThermoMLArchive", key, "static_permittivity")
    if row["A"] and row["Tmin"]:
        c = numbers(row, "ABCD")
        while c[-1] == 0.0:
            c.pop()
        low, high = float(row["Tmin"]), float(row["Tmax"])
        ends = trimmed(key, low, min(high, 413.15))
        block = {
            "form": "polynomial", "published": {"coefficients": c}, "range": ends,
            "sources": ["CRCHandbook2014"], "place": place, "source_uncertainty": 0.01,
        }  # fmt: skip
        if papers:
            yield block | {"second": [selection("ThermoMLArchive")]}
        single = {"single": True, "single_reason": "one seen source"}
        if ends[0] <= T <= ends[1]:
            yield block | single | {
                "checks": [{"T": T, "value": value, "source": "CRCHandbook2014",
                            "place": "printed value beside the polynomial", "tolerance": 0.015}],
            }  # fmt: skip
        at = round((ends[0] + ends[1]) / 2, 2)
        yield block | single | {
            "checks": [{"T": at, "value": float(f"{sum(a * at**n for n, a in enumerate(c)):.6g}"),
                        "source": "CRCHandbook2014", "place": f"{place}, evaluated",
                        "tolerance": 0.001}],
        }  # fmt: skip
    spot = Point("", "", T, math.nan, value)
    yield spot_block(key, "static_permittivity", spot, 0.02, 2.5, "CRCHandbook2014", place)


def speed_of_sound(key: str) -> Iterator[Block]:
    papers = points("ThermoMLArchive", key, "speed_of_sound")
    if len(papers) < 3:
        return
    low, high = span(papers)
    if high - low < 4:
        return
    yield {
        "form": "polynomial", "degree": 1, "range": trimmed(key, low, high), "robust": "huber",
        "fit": [selection("ThermoMLArchive")], "place": "papers in the archive, doi per point",
        "source_uncertainty": 0.003,
    }  # fmt: skip


def diffusivity_in_air(key: str) -> Iterator[Block]:
    (point,) = points("Fuller1966", key, "diffusivity_in_air")
    measured = [
        selection(name)
        for name in ("Perry", "Welty1984")
        if points(name, key, "diffusivity_in_air")
    ]
    block = {
        "form": "power",
        "published": {"A": point.value, "n": 1.75, "reference_temperature": 298.15},
        "range": [273.15, 353.15], "sources": ["Fuller1966"],
        "checks": [{"T": 298.15, "value": point.value, "source": "Fuller1966",
                    "place": "data/published/liquids/Fuller1966_organics.csv", "tolerance": 0.01}],
    }  # fmt: skip
    estimate = {
        "grade": "estimated",
        "source_uncertainty": 0.08,
        "place": "estimate by the method",
    }
    if measured:
        yield (
            block
            | estimate
            | {
                "second": measured,
                "place": "estimate by the method, beside measured values",
            }
        )
    yield block | estimate


def refractive_index(key: str) -> Iterator[Block]:
    for point in points("CRCHandbook2014", key, "refractive_index")[:1]:
        yield spot_block(
            key, "refractive_index", point, 0.0005, 2.5, "CRCHandbook2014",
            "table Physical Constants of Organic Compounds",
        )  # fmt: skip


def electrical_conductivity(key: str) -> Iterator[Block]:
    for point in points("Lange", key, "electrical_conductivity")[:1]:
        block = spot_block(
            key, "electrical_conductivity", point, 2.0, 5.0, "Lange",
            "table of electrical conductivity",
        )  # fmt: skip
        yield block | {
            "single_reason": "one seen source; an order of magnitude, traces of water and ions "
            "govern it"
        }


RULES = {
    rule.__name__: rule
    for rule in (
        density, viscosity, surface_tension, vapour_pressure, heat_of_vaporisation, heat_capacity,
        thermal_conductivity, static_permittivity, speed_of_sound, diffusivity_in_air,
        refractive_index, electrical_conductivity,
    )
}  # fmt: skip


def judged(subject: Liquid, prop: str, key: str) -> tuple[Block | None, str]:
    """Of the candidates that earn a good grade the surest that is wide; else the first single."""
    against: list[str] = []
    good: list[tuple[float, float, Block, str]] = []
    fallback: tuple[Block, str] | None = None
    for block in RULES[prop](key):
        try:
            built = build_block(subject, prop, block, PUBLISHED)
        except (BuildError, ValueError, np.linalg.LinAlgError) as error:
            against.append(str(error))
        else:
            grade, u = built.record["grade"], built.record["uncertainty"]
            if grade in ("reference", "measured", "estimated"):
                words = f"{grade} {100 * u:.2g} %"
                if grade != "measured" or prop not in ("density", "viscosity", "surface_tension"):
                    return block, words
                good.append((u, block["range"][1] - block["range"][0], block, words))
            fallback = fallback or (block, "single")
            continue
        if fallback is None and block.get("grade") != "reference":
            reason = against[-1].split(": ", 2)[-1]
            alone = block | {"single": True, "single_reason": reason}
            try:
                built = build_block(subject, prop, alone, PUBLISHED)
            except (BuildError, ValueError, np.linalg.LinAlgError) as error:
                against.append(str(error))
            else:
                u = built.record["uncertainty"]
                if u < 0.06:
                    fallback = (alone, f"single {100 * u:.2g} %: {reason}")
    if good:
        # Handbooks that agree with each other weigh less than papers that scatter.
        archive = organics("ThermoMLArchive")
        with_papers = [
            entry
            for entry in good
            if any(
                one["file"] == archive
                for role in ("fit", "second")
                for one in entry[2].get(role, [])
            )
        ]
        good = with_papers or good
        widest = max(width for _, width, _, _ in good)
        wide = [entry for entry in good if entry[1] >= 0.4 * widest]
        least = min(u for u, _, _, _ in wide)
        return next((block, words) for u, _, block, words in wide if u <= 1.3 * least)
    return fallback or (None, "; ".join(against[:2]))


def facts(key: str, flashes: dict[str, dict[str, str]]) -> Block:
    cas = CAS[key]
    found: Block = {
        "molar_mass": {
            "value": float(f"{float(identifiers()[cas][1]) / 1000:.9g}"), "source": "PubChem",
            "place": "formula weight in the identifier table",
        }
    }  # fmt: skip
    row = table_csv("Misc", "Physical Constants of Organic Compounds.csv").get(cas)
    place = "Physical Constants of Organic Compounds"
    for name, column in (("melting_point", "Tm"), ("boiling_point", "Tb")):
        if row and row[column]:
            found[name] = {
                "value": float(row[column]),
                "source": "CRCHandbook2014",
                "place": place,
            }
    row = table("Critical Properties", "CRCCriticalOrganics.tsv").get(cas)
    for name, column in (("critical_temperature", "Tc"), ("critical_pressure", "Pc")):
        if row and row[column]:
            found[name] = {
                "value": float(row[column]), "source": "CRCHandbook2014",
                "place": "Critical Constants of Organic Compounds",
            }  # fmt: skip
    row = flashes.get(cas)
    if row:
        known = [
            (float(row[column]), source)
            for column, source in (
                ("T_flash_nfpa497_K", "NFPA497"), ("T_flash_iec60079_20_1_K", "IEC60079"),
            )
            if row[column]
        ]  # fmt: skip
        if known:
            value, source = min(known)
            note = "method from memory, the copy names none"
            if len(known) == 2 and known[0][0] != known[1][0]:
                high, other = max(known)
                note += f"; {other} gives {high:g} K, the lower is stored"
            found["flash_point"] = {
                "value": value, "method": "closed cup", "source": source,
                "place": row["substance"], "note": note,
            }  # fmt: skip
    return found


def text(value: Any) -> str:
    if isinstance(value, bool):
        return "true" if value else "false"
    if isinstance(value, str):
        return json.dumps(value, ensure_ascii=False)
    if isinstance(value, dict):
        return "{ " + ", ".join(f"{k} = {text(v)}" for k, v in value.items()) + " }"
    if isinstance(value, (list, tuple)):
        return "[" + ", ".join(text(v) for v in value) + "]"
    return repr(float(value)) if isinstance(value, float) else str(value)


def write(path: Path, head: Block, constants: Block, blocks: dict[str, Block]) -> None:
    lines = [f"{k} = {text(v)}" for k, v in head.items()]
    for name, fact in constants.items():
        lines += ["", f"[{name}]", *(f"{k} = {text(v)}" for k, v in fact.items())]
    for prop, block in blocks.items():
        lines += ["", f"[[{prop}]]", *(f"{k} = {text(v)}" for k, v in block.items())]
    path.write_text("\n".join(lines) + "\n", encoding="utf-8")


def main(folder: Path, wanted: list[str]) -> None:
    flashes = {row["cas"]: row for row in reference(folder, "flash_points")[1] if not row["flag"]}
    for row in SUBJECTS:
        key = row["key"]
        path = DATA / "build" / "specs" / "liquids" / f"{key}.toml"
        if path.exists() or (wanted and key not in wanted):
            continue
        head: Block = {
            "name": row["name"], "cas": row["cas"], "formula": identifiers()[row["cas"]][0],
            "family": row["family"], "kind": "liquid", "amphiphile": row["amphiphile"] == "true",
            "synonyms": [s for s in row["synonyms"].split(";") if s], "cautions": [],
        }  # fmt: skip
        constants = facts(key, flashes)
        subject = Liquid(key, head | constants)
        blocks = {}
        print(key)
        for prop in RULES:
            block, words = judged(subject, prop, key)
            print(f"   {prop}: {words or 'nothing seen'}")
            if block is not None:
                blocks[prop] = block
        write(path, head, constants, blocks)


if __name__ == "__main__":
    main(Path(sys.argv[1]), sys.argv[2:])
