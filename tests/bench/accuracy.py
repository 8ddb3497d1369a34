"""How close dropkit comes to every published point that it ships, and to water's standards.

Run it:  python tests/bench/accuracy.py [--markdown]

A point counts if its temperature and composition lie in the stated range of the record
and it stands in no row of data/published/excluded.csv. Left-out errors are those that the
builder wrote into the records: a source, or every fifth point, refitted without.
"""

from __future__ import annotations

import sys
import warnings
from collections.abc import Iterator
from pathlib import Path
from typing import Any

import numpy as np
import pandas as pd

import dropkit as dk
from dropkit import records
from dropkit.properties.composition import to_mass
from dropkit.properties.points import exclusion
from dropkit.properties.property_words import GRADED
from dropkit.published_rows import published_file

PAGE_HEAD = """# How close the records come to published points

Written by `python tests/bench/accuracy.py --markdown`; a test keeps it current. A point counts if it
lies in the stated range of its record and stands in no row of `data/published/excluded.csv`, which
gives the reason and the contradicting source of each exclusion. `reach` is what the project set out to
reach; what falls short says False. Deviations are ours over theirs minus one, in percent.

The figure to quote for a fit is not its residual but the error on what was left out of it: a source, or
every fifth point where there is one source; it stands beside each. For records that follow a reference
equation, "left out" tells only how well the form follows that equation; there the deviation from the
points, which were not fitted, is the figure. Handbook equations are shown apart: they tell how
handbooks differ. Causes of the larger deviations are in [data notes](data-notes.md).
"""

PURE_REACH = {"density": (0.05, 0.3), "viscosity": (1.5, 5.0), "surface_tension": (1.0, 3.0)}
PAIR_REACH = {"density": 0.1, "viscosity": 3.0, "surface_tension": 2.0}


def rows(folder: str) -> Iterator[tuple[str, dict[str, str]]]:
    """Every published row of a folder that isn't excluded, with the name of its file."""
    for path in sorted((records.data_dir() / "published" / folder).glob("*.csv")):
        name = f"{folder}/{path.stem}"
        for row in published_file(path, name):
            if not exclusion(name, row):
                yield name, row


# Files of values that we evaluated from handbook equations: they tell how handbooks differ,
# not how nature does, and stand in a table of their own.
EQUATIONS = ("PerryGreen2008", "_equations", "Mulero20", "Poling2001", "McGarry1983", "Cheng2008")


def from_equation(name: str, row: dict[str, str]) -> bool:
    """Whether a row was evaluated from a handbook's equation."""
    return row.get("doi") == "equation" or any(word in name for word in EQUATIONS)


def recalled(name: str) -> bool:
    """Files from memory count towards no target."""
    return "recalled" in name


def pure_points() -> pd.DataFrame:
    """Deviation in percent of each pure liquid from each published point in range."""
    found: list[dict[str, Any]] = []
    table = pd.DataFrame(
        [{"file": n, "equation": from_equation(n, row), **row} for n, row in rows("liquids")]
    )
    for (key, prop), part in table.groupby(["liquid", "property"]):
        if prop not in GRADED or records.liquid_record(str(key)).kind != "liquid":
            continue
        fluid = dk.liquid(str(key))
        if prop not in fluid.available():
            continue
        kelvin = part["T_K"].to_numpy(float)
        value = part["value"].to_numpy(float)
        ours = getattr(fluid, str(prop))(kelvin, outside="nan")
        columns = (part["file"], part["equation"], kelvin, value, ours)
        for name, equation, t, y, f in zip(*columns, strict=True):
            if np.isfinite(f):
                found.append(
                    {
                        "liquid": key,
                        "property": prop,
                        "file": name,
                        "equation": equation,
                        "T": t,
                        "off": 100 * (f / y - 1),
                    }
                )
    return pd.DataFrame(found)


def pair_points() -> pd.DataFrame:
    """Deviation in percent of each fitted pair from each published point in range."""
    found: list[dict[str, Any]] = []
    table = pd.DataFrame([{"file": name, **row} for name, row in rows("mixtures")])
    for (a, b, basis), part in table.groupby(["component_1", "component_2", "basis"]):
        keys = (str(a), str(b))
        pair = records.pair_record(*keys)
        if pair is None:
            continue
        for prop, group in part.groupby("property"):
            if prop not in pair.properties or prop not in GRADED:
                continue
            share = group["fraction_1"].to_numpy(float)
            mass = to_mass(keys, (share, 1.0 - share), str(basis))
            kelvin = group["T_K"].to_numpy(float)
            frame = pd.DataFrame({"temperature": kelvin, keys[0]: mass[0], keys[1]: mass[1]})
            result = dk.lookup(frame, [str(prop)], by="mass")
            ours = result.filter(like=f"{prop} [").iloc[:, 0].to_numpy()
            for name, t, w, y, f in zip(
                group["file"], kelvin, mass[0], group["value"].to_numpy(float), ours, strict=True
            ):
                if np.isfinite(f):
                    found.append(
                        {"pair": f"{a} + {b}", "property": prop, "file": name, "T": t, "w": w,
                         "value": y, "off": 100 * (f / y - 1), "absolute": f - y}
                    )  # fmt: skip
    return pd.DataFrame(found)


def _left_out(record: Any) -> str:
    entry = record.left_out
    if not entry:
        return ""
    return f"{100 * entry['median']:.2g} / {100 * entry['p95']:.2g}"


def pure_table(points: pd.DataFrame) -> pd.DataFrame:
    """Median and 95 % of the deviations by liquid and property, beside the reach."""
    lines = []
    for (key, prop), part in points.groupby(["liquid", "property"]):
        off = part["off"].abs()
        median, most = PURE_REACH[prop]
        blocks = records.liquid_record(key).properties[prop]
        lines.append(
            {
                "liquid": key,
                "property": prop,
                "points": len(off),
                "median %": round(off.median(), 3),
                "95 %": round(off.quantile(0.95), 3),
                "reach": f"{median} / {most}",
                "reached": off.median() <= median and off.quantile(0.95) <= most,
                "left out, median / 95 %": _left_out(blocks[0]),
                "grade": blocks[0].grade,
            }
        )
    return pd.DataFrame(lines)


def pooled_table(points: pd.DataFrame) -> pd.DataFrame:
    """All pure liquids together, by property."""
    lines = []
    for prop, part in points.groupby("property"):
        off = part["off"].abs()
        median, most = PURE_REACH[str(prop)]
        lines.append(
            {"property": prop, "points": len(off), "median %": round(off.median(), 3),
             "95 %": round(off.quantile(0.95), 3), "reach": f"{median} / {most}",
             "reached": off.median() <= median and off.quantile(0.95) <= most}
        )  # fmt: skip
    return pd.DataFrame(lines)


def pair_table(points: pd.DataFrame) -> pd.DataFrame:
    """Median per file, worst, and points beyond three times the reach."""
    lines = []
    for (pair, prop, name), part in points.groupby(["pair", "property", "file"]):
        off = part["off"].abs()
        reach = PAIR_REACH[prop]
        block = records.pair_record(*pair.split(" + ")).properties[prop][0]
        lines.append(
            {
                "pair": pair,
                "property": prop,
                "file": name.rpartition("/")[2],
                "points": len(off),
                "median %": round(off.median(), 3),
                "worst %": round(off.max(), 2),
                "reach": reach,
                "reached": off.median() <= reach,
                "beyond 3x": int((off > 3 * reach).sum()),
                "left out, median / 95 %": _left_out(block),
                "from memory": recalled(name),
            }
        )
    return pd.DataFrame(lines)


def water_table() -> pd.DataFrame:
    """Water against the IAPWS formulations at 0 to 100 degC and 1 atm or saturation."""
    from CoolProp.CoolProp import PropsSI

    kelvin = np.linspace(273.16, 373.12, 101)
    water = dk.liquid("water")
    density = np.array([PropsSI("D", "T", t, "Q", 0, "Water") for t in kelvin])
    viscosity = np.array([PropsSI("V", "T", t, "Q", 0, "Water") for t in kelvin])
    # CoolProp's surface tension of water isn't IAPWS'; R1-76(2014) in closed form.
    tau = 1.0 - kelvin / 647.096
    tension = 0.2358 * tau**1.256 * (1.0 - 0.625 * tau)
    lines = []
    for prop, standard, reach in (
        ("density", density, 0.01),
        ("viscosity", viscosity, 0.1),
        ("surface_tension", tension, 0.05),
    ):
        off = 100 * np.abs(getattr(water, prop)(kelvin) / standard - 1)
        lines.append({"property": prop, "worst %": float(off.max()), "reach": reach,
                      "reached": bool(off.max() <= reach)})  # fmt: skip
    return pd.DataFrame(lines)


def special_table(points: pd.DataFrame, pure: pd.DataFrame) -> pd.DataFrame:
    """The reaches that the two chief mixtures have of their own."""
    lines = []

    def line(what: str, value: float, reach: float, unit: str = "%") -> None:
        lines.append({"what": what, "worst": round(float(value), 4), "reach": reach, "unit": unit,
                      "reached": bool(value <= reach)})  # fmt: skip

    def pick(pair: str, prop: str, name: str = "") -> pd.DataFrame:
        chosen = points[(points["pair"] == pair) & (points["property"] == prop)]
        return chosen[chosen["file"].str.endswith(name)] if name else chosen

    glycerol, ethanol = "glycerol + water", "ethanol + water"
    segur = pick(glycerol, "viscosity", "SegurOberstar1951")
    ends = pure[(pure["property"] == "viscosity") & pure["file"].str.endswith("SegurOberstar1951")]
    # Their column for water, 0 to 40 degC by tens, as both reprints have it.
    kelvin = np.array([273.15, 283.15, 293.15, 303.15, 313.15])
    water = np.array([1.792e-3, 1.308e-3, 1.005e-3, 0.8007e-3, 0.656e-3])
    wet = pd.Series(100 * (dk.liquid("water").viscosity(kelvin) / water - 1))
    every = pd.concat([segur.off, ends.off, wet]).abs()
    line(f"glycerol viscosity, Segur & Oberstar ({len(every)} points)", every.max(), 2.5)
    bosart = pick(glycerol, "density", "BosartSnoddy1927")
    line(f"glycerol density, Bosart & Snoddy ({len(bosart)})", bosart.off.abs().max(), 0.06)
    egorov = pick(glycerol, "density", "Egorov2013")
    cool = egorov[egorov["T"] <= 333.16]
    hot = egorov[egorov["T"] > 333.16]
    line(f"glycerol density, Egorov to 60 degC ({len(cool)})", cool.off.abs().max(), 0.1)
    line(f"glycerol density, Egorov above 60 degC ({len(hot)})", hot.off.abs().max(), 0.2)
    both, alone = _from_mean(pick(glycerol, "surface_tension"))
    line("glycerol surface tension to 50 degC, mean of both sources", both, 1.0, "mN/m")
    line("glycerol surface tension to 50 degC, where one source is", alone, 1.0, "mN/m")
    oiml = pick(ethanol, "density", "OIMLR22")
    line(f"ethanol density, OIML R 22 ({len(oiml)})", oiml.off.abs().max(), 0.05)
    viscosity = pick(ethanol, "viscosity")
    line(f"ethanol viscosity, median ({len(viscosity)})", viscosity.off.abs().median(), 3.0)
    line("ethanol viscosity, worst", viscosity.off.abs().max(), 7.0)
    tension = pick(ethanol, "surface_tension")
    seen = tension[~tension["file"].map(recalled)]
    if len(seen):
        line(f"ethanol surface tension, seen sources ({len(seen)})", seen.off.abs().median(), 1.5)
    memory = tension[tension["file"].map(recalled)]
    if len(memory):
        line(f"ethanol surface tension, from memory, median ({len(memory)})",
             memory.off.abs().median(), 1.5)  # fmt: skip
    return pd.DataFrame(lines)


def _from_mean(points: pd.DataFrame) -> tuple[float, float]:
    """Worst distances [mN/m] to 50 degC: from the mean of both sources, from the one there is.

    The producers' table has two concentrations only; between and near them (mass fractions
    above 0.5) a plane through its five points stands for it at Takamura's points.
    """
    points = points[points["T"] <= 323.16]
    takamura = points[points["file"].str.endswith("Takamura2012")]
    other = points[points["file"].str.endswith("GPA1963")]
    sides = np.column_stack([np.ones(len(other)), other["w"], other["T"]])
    plane = np.linalg.lstsq(sides, other["value"].to_numpy(), rcond=None)[0]
    both, alone = 0.0, 0.0
    for _, row in takamura.iterrows():
        ours = row["value"] + row["absolute"]
        if row["w"] > 0.5:
            second = plane @ [1.0, row["w"], row["T"]]
            both = max(both, 1e3 * abs(ours - 0.5 * (row["value"] + second)))
        else:
            alone = max(alone, 1e3 * abs(ours - row["value"]))
    return both, alone


def tables() -> dict[str, pd.DataFrame]:
    """All tables by title, in the order of the page."""
    pure, pairs = pure_points(), pair_points()
    beyond = pairs[pairs["off"].abs() > 3 * pairs["property"].map(PAIR_REACH)]
    return {
        "Water against IAPWS": water_table(),
        "Glycerol-water and ethanol-water": special_table(pairs, pure),
        "Pure liquids together, tabulated points": pooled_table(pure[~pure["equation"]]),
        "Pure liquids together, handbook equations": pooled_table(pure[pure["equation"]]),
        "Pure liquids one by one, tabulated points": pure_table(pure[~pure["equation"]]),
        "Pairs, by file": pair_table(pairs),
        "Points of pairs beyond three times the reach": beyond[
            ["pair", "property", "file", "T", "w", "value", "off"]
        ].round(5),
    }


def page(found: dict[str, pd.DataFrame] | None = None) -> str:
    """The page docs/accuracy.md."""
    parts = [PAGE_HEAD]
    parts += [f"## {title}\n\n{markdown(table)}\n" for title, table in (found or tables()).items()]
    return "\n".join(parts)


def main(arguments: list[str]) -> None:
    """Print all tables; with --markdown, the page docs/accuracy.md."""
    warnings.simplefilter("ignore")
    if "--markdown" in arguments:
        print(page(), end="")
        return
    for title, table in tables().items():
        print(f"\n{title}\n{table.to_string(index=False)}")


def markdown(table: pd.DataFrame) -> str:
    """A table in Markdown."""
    head = "| " + " | ".join(map(str, table.columns)) + " |"
    rule = "|" + " --- |" * len(table.columns)
    body = ["| " + " | ".join(map(_cell, row)) + " |" for row in table.itertuples(index=False)]
    return "\n".join([head, rule, *body])


def _cell(value: Any) -> str:
    return f"{value:.3g}" if isinstance(value, float) and abs(value) < 0.01 else str(value)


if __name__ == "__main__":
    sys.path.insert(0, str(Path(__file__).parent))
    main(sys.argv[1:])
