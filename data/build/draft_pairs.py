"""First drafts of specs for pairs, to be read and mended by hand; see `draft_organics.py`.

    python data/build/draft_pairs.py [pair ...]

Every pair of `data/published/mixtures` without a spec gets one: for each property the numbers of
rows and columns are those with the smallest left-out error among a few. Liquids come first: their
records are the ends. A pair with density alone is drafted too, but is no fitted mixture.
"""

from __future__ import annotations

import sys
from collections import defaultdict
from pathlib import Path
from typing import Any

import numpy as np
from draft_organics import text
from record_builder import BuildError
from record_builder.blocks import Built, build_block
from record_builder.points import Published
from record_builder.subjects import Pair

from dropkit.published_rows import published_file

DATA = Path(__file__).resolve().parent.parent
PUBLISHED = Published(DATA / "published")
PROPERTIES = ("density", "viscosity", "surface_tension", "refractive_index")
FLOOR = {"density": 0.0005, "viscosity": 0.015, "surface_tension": 0.01, "refractive_index": 0.0003}


def files() -> dict[str, dict[str, list[str]]]:
    """Pair -> property -> files that hold points of it."""
    found: dict[str, dict[str, list[str]]] = defaultdict(lambda: defaultdict(list))
    for path in sorted((DATA / "published" / "mixtures").glob("*.csv")):
        for row in published_file(path):
            pair = f"{row['component_1']}__{row['component_2']}"
            name = f"mixtures/{path.stem}"
            if name not in found[pair][row["property"]]:
                found[pair][row["property"]].append(name)
    return found


def best(pair: Pair, prop: str, names: list[str]) -> tuple[dict[str, Any] | None, str]:
    points = [
        p
        for name in names
        for p in PUBLISHED.read(name, prop, pair.names, pair.molar_masses)
        if not p.excluded
    ]
    if len(points) < 5:
        return None, f"{len(points)} points"
    T = np.array([p.temperature for p in points])
    w = np.array([p.fraction for p in points])
    low, high = float(T.min()), float(T.max())
    spread = high - low
    temperatures = len({round(t) for t in T})
    ends = (
        [round(low - 2, 2), round(high + 2, 2)] if spread < 1 else [round(low, 2), round(high, 2)]
    )
    fractions = [0.0, 1.0]
    if w.min() > 0.3:
        fractions[0] = float(f"{w.min():.3f}") - 0.001
    if w.max() < 0.7:
        fractions[1] = float(f"{w.max():.3f}") + 0.001
    found: list[tuple[float, dict[str, Any], Built]] = []
    against = ""
    for rows in (1, 2, 3, 4):
        for columns in (1, 2, 3):
            if columns > 1 and (temperatures < 2 * columns - 1 or spread < 10):
                continue
            if len(points) < 2 * rows * columns + 2:
                continue
            block: dict[str, Any] = {
                "rows": rows, "columns": columns, "range": ends, "fraction_range": fractions,
                "fit": [{"file": name} for name in names], "robust": "huber",
                "source_uncertainty": FLOOR[prop], "place": "tables of the papers, doi per point",
                "left_out": "every fifth",
            }  # fmt: skip
            if len({p.source for p in points}) == 1:
                block |= {"single": True, "single_reason": "one seen source"}
            else:
                block.pop("left_out")
            try:
                built = build_block(pair, prop, block, PUBLISHED)
            except (BuildError, ValueError, np.linalg.LinAlgError) as error:
                against = str(error)
                if "single" in block:
                    continue
                block |= {"single": True, "single_reason": against.split(": ", 2)[-1]}
                try:
                    built = build_block(pair, prop, block, PUBLISHED)
                except (BuildError, ValueError, np.linalg.LinAlgError) as again:
                    against = str(again)
                    continue
            if "left_out" not in built.record:  # no source can be spared
                block["left_out"] = "every fifth"
                try:
                    built = build_block(pair, prop, block, PUBLISHED)
                except (BuildError, ValueError, np.linalg.LinAlgError) as again:
                    against = str(again)
                    continue
            error = built.record["left_out"]["median"] + 0.3 * built.record["left_out"]["p95"]
            single = 1.3 if built.record["grade"] == "single" else 1.0
            found.append((error * single * (1 + 0.03 * rows * columns), block, built))
    if not found:
        return None, against or "no fit"
    _, block, built = min(found, key=lambda entry: entry[0])
    left = built.record["left_out"]
    return block, (
        f"{built.record['grade']}, {len(points)} points, left out {100 * left['median']:.2g} / "
        f"{100 * left['p95']:.2g} %, rows {block['rows']}, columns {block['columns']}"
    )


def main(wanted: list[str]) -> None:
    for name, properties in sorted(files().items()):
        path = DATA / "build" / "specs" / "mixtures" / f"{name}.toml"
        if path.exists() or (wanted and name not in wanted):
            continue
        spec = {"components": name.split("__")}
        if not all((DATA / "liquids" / f"{key}.toml").exists() for key in spec["components"]):
            print(f"{name}: an end has no record yet")
            continue
        pair = Pair(name, spec, DATA / "liquids")
        lines = [f"components = {text(spec['components'])}"]
        print(name)
        for prop in PROPERTIES:
            if prop not in properties:
                continue
            block, words = best(pair, prop, properties[prop])
            print(f"   {prop}: {words}")
            if block is not None:
                lines += ["", f"[[{prop}]]", *(f"{k} = {text(v)}" for k, v in block.items())]
        if len(lines) > 1:
            path.write_text("\n".join(lines) + "\n", encoding="utf-8")


if __name__ == "__main__":
    main(sys.argv[1:])
