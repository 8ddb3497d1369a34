"""Writes the table of `docs/interfaces.md` anew from the records; run it after they changed."""

from __future__ import annotations

import re
from pathlib import Path

import dropkit as dk

PAGE = Path(__file__).resolve().parents[2] / "docs" / "interfaces.md"
HEAD = "| pair | degC | mN/m | 95 % | grade | sources |\n|---|---|---|---|---|---|\n"


def table() -> str:
    """One row per pair: range, value in its middle, band, grade, sources."""
    rows = []
    for row in dk.liquid_pairs().to_dict("records"):
        pair = dk.liquid_pair(row["liquid_1"], row["liquid_2"])
        cells = [
            f"{row['liquid_1']} / {row['liquid_2']}",
            f"{row['low'] - 273.15:g} to {row['high'] - 273.15:g}",
            f"{1e3 * row['interfacial_tension']:.4g}",
            f"{200 * row['uncertainty']:.2g} %",
            row["grade"],
            ", ".join(pair.sources),
        ]
        rows.append(f"| {' | '.join(cells)} |\n")
    return HEAD + "".join(rows)


if __name__ == "__main__":
    page = PAGE.read_text(encoding="utf-8")
    PAGE.write_text(re.sub(re.escape(HEAD) + r"(?:\|.*\n)*", lambda _: table(), page), "utf-8")
