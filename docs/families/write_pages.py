"""Write the pages of this folder from the records: one page per family, and what is missing.

    python docs/families/write_pages.py             # pages and pictures
    python docs/families/write_pages.py --no-pictures

A test compares the pages with what this writes, so they can't fall behind the records.
"""

from __future__ import annotations

import io
import sys
import tomllib
import warnings
from collections import defaultdict
from collections.abc import Iterator
from pathlib import Path

import dropkit as dk
from dropkit import records
from dropkit.errors import DropkitError
from dropkit.properties import display
from dropkit.record_types import LEADING, PROPERTIES, LiquidRecord, PropertyRecord

HERE = Path(__file__).resolve().parent
PICTURES = HERE / "pictures"
AT = (293.15, 298.15)
TITLES = {
    "acid": "Acids", "acrylate": "Acrylates", "alcohol": "Alcohols", "alkane": "Alkanes",
    "alloy": "Alloys", "amide": "Amides and lactams", "amine": "Amines", "aromatic": "Aromatics",
    "carbonate": "Carbonates", "cycloalkane": "Cycloalkanes", "ester": "Esters and lactones",
    "ether": "Ethers", "fluorinated": "Fluorinated liquids", "fuel": "Fuels, technical",
    "glycol_ether": "Glycol ethers", "halogenated": "Chlorinated liquids", "ketone": "Ketones",
    "melt": "Melts", "metal": "Metals", "nitrile": "Nitriles", "nitro": "Nitro compounds",
    "oil": "Oils and fatty esters", "polyol": "Glycols and glycerol", "polymer": "Polymers",
    "propellant": "Propellants", "salt": "Salts (in water)", "siloxane": "Siloxanes",
    "sulfone": "Sulfones", "sulfoxide": "Sulfoxides", "terpene": "Terpenes", "water": "Water",
}  # fmt: skip
UNITS = {name: display.unit_of(name) for name in PROPERTIES}


def title(family: str) -> str:
    return TITLES.get(family, family.replace("_", " ").capitalize())


def page_name(family: str) -> str:
    return f"{family.replace('_', '-')}.md"


def by_family() -> dict[str, list[LiquidRecord]]:
    found: dict[str, list[LiquidRecord]] = defaultdict(list)
    for key, row in dk.liquids().iterrows():
        if row["kind"] == "liquid":
            found[row["family"]].append(records.liquid_record(str(key)))
    return dict(sorted(found.items(), key=lambda item: title(item[0])))


def number(value: float) -> str:
    if 0.001 <= abs(value) < 100000:
        digits = max(0, 3 - len(str(int(abs(value)))) + (abs(value) < 1))
        return f"{value:.{min(digits + 1, 4)}f}" if abs(value) < 1000 else f"{value:.1f}"
    return f"{value:.3g}"


def value_at(block: PropertyRecord, T: float) -> str:
    """Value of one block in the trade's unit, or a dash where its range does not hold."""
    if not block.range.holds(T):
        return "–"
    from dropkit.properties.equations import FORMS

    return number(display.in_stock(block.property, FORMS[block.form].scalar(block.parameters)(T)))


def celsius(low: float, high: float) -> str:
    return f"{low - 273.15:.0f} to {high - 273.15:.0f}"


def second(block: PropertyRecord) -> str:
    """How far an independent source stands off, or what was left out."""
    if block.second is not None:
        s = block.second
        return (
            f"{100 * s['median']:.2g} / {100 * s['worst']:.2g} ({s['points']:.0f} of {s['source']})"
        )
    if block.left_out is not None:
        entry = block.left_out
        return f"left out: {100 * entry['median']:.2g} / {100 * entry['p95']:.2g}"
    return "none"


def band(block: PropertyRecord) -> str:
    if block.uncertainty_absolute is not None and block.property != "electrical_conductivity":
        return f"{number(display.in_stock(block.property, 2 * block.uncertainty_absolute))} abs."
    if block.uncertainty >= 0.5:
        return f"factor {1 + 2 * block.uncertainty:.2g}"
    return f"{200 * block.uncertainty:.2g} %"


def facts(record: LiquidRecord) -> str:
    parts = []
    if record.cas:
        parts.append(f"CAS {record.cas}")
    if record.formula:
        parts.append(record.formula)
    parts.append(f"{1000 * record.molar_mass:.6g} g/mol")
    for name in ("melting_point", "boiling_point", "flash_point"):
        fact = record.facts.get(name)
        if fact is not None:
            method = f" ({fact['method']})" if "method" in fact else ""
            parts.append(f"{name.replace('_', ' ')} {fact['value'] - 273.15:.1f} degC{method}")
    for name, unit in (("heat_of_fusion", "kJ/kg"), ("solid_density", "kg/m3")):
        fact = record.facts.get(name)
        if fact is not None:
            scale = 1e-3 if name == "heat_of_fusion" else 1.0
            parts.append(f"{name.replace('_', ' ')} {fact['value'] * scale:.4g} {unit}")
    if record.synonyms:
        parts.append("also called " + ", ".join(record.synonyms))
    return "; ".join(parts)


def rows(record: LiquidRecord) -> Iterator[str]:
    for name in PROPERTIES:
        for block in record.properties.get(name, ()):
            sources = ", ".join(dict.fromkeys(block.sources))
            yield (
                f"| {name.replace('_', ' ')} [{UNITS[name]}] | {value_at(block, AT[0])} "
                f"| {value_at(block, AT[1])} | {band(block)} | {block.grade} "
                f"| {celsius(block.range.low, block.range.high)} | {sources} | {second(block)} |"
            )


HEAD = (
    "| property | at 20 degC | at 25 degC | 95 % band | grade | range [degC] | sources "
    "| second source: median / worst deviation [%] |\n|" + " --- |" * 8
)


def page(family: str, found: list[LiquidRecord]) -> str:
    lines = [
        f"# {title(family)}",
        "",
        "Written by `python docs/families/write_pages.py` from the records; a test keeps it current.",
        "Values are those of the saturated liquid. Handle every liquid by its safety data sheet, "
        "local codes and licensed practice; nothing here replaces them.",
        "",
    ]
    keys: dict[str, None] = {}
    for record in found:
        lines += [f"## {record.name}", "", f"`{record.key}`: {facts(record)}.", ""]
        for caution in record.cautions:
            lines += [f"*{caution}*", ""]
        lines += [HEAD, *rows(record), ""]
        absent = [n.replace("_", " ") for n in PROPERTIES if n not in record.properties]
        if absent:
            lines += [f"Not seen: {', '.join(absent)}.", ""]
        if any(name in record.properties for name in LEADING):
            lines += [f"![{record.name}](pictures/{record.key}.png)", ""]
        for blocks in record.properties.values():
            for block in blocks:
                keys.update(dict.fromkeys(block.sources))
                if block.second is not None:
                    keys[block.second["source"]] = None
    lines += ["## Sources", ""]
    for key in sorted(keys):
        source = records.source(key)
        doi = f", doi:{source.doi}" if source.doi else ""
        lines.append(f"- **{key}**: {source.citation}{doi}. Seen: {source.seen}.")
    return "\n".join(lines) + "\n"


def overview(families: dict[str, list[LiquidRecord]]) -> str:
    lines = [
        "# The liquids by family",
        "",
        "Written by `python docs/families/write_pages.py` from the records; a test keeps it current.",
        "The grade is the worst of density, viscosity and surface tension; a dash says that one of "
        "them is [missing](missing.md).",
        "",
    ]
    everything = [record for found in families.values() for record in found]
    complete = [r for r in everything if r.grade is not None]
    good = [r for r in complete if r.grade in ("reference", "measured")]
    lines += [
        f"{len(everything)} liquids; {len(complete)} have density, viscosity and surface tension, "
        f"{len(good)} of these all three measured or reference.",
        "",
        "| family | liquids |",
        "| --- | --- |",
    ]
    for family, found in families.items():
        names = ", ".join(f"{r.name} ({r.grade or '–'})" for r in found)
        lines.append(f"| [{title(family)}]({page_name(family)}) | {names} |")
    return "\n".join(lines) + "\n"


def missing(families: dict[str, list[LiquidRecord]]) -> str:
    with (HERE / "missing.toml").open("rb") as handle:
        notes = tomllib.load(handle)
    lines = [
        "# What is missing, and why",
        "",
        "Written by `python docs/families/write_pages.py` from the records and from "
        "`missing.toml`; a test keeps it current.",
        "",
        "## Liquids without one of density, viscosity and surface tension",
        "",
        "| liquid | missing | why |",
        "| --- | --- | --- |",
    ]
    reasons = notes["incomplete"]
    for found in families.values():
        for record in found:
            absent = [n.replace("_", " ") for n in LEADING if n not in record.properties]
            if absent:
                why = reasons.get(record.key, "no trustworthy source was seen")
                lines.append(f"| {record.name} | {', '.join(absent)} | {why} |")
    lines += ["", "## Complete, but not all three measured or reference", "",
              "| liquid | property | grade | why |", "| --- | --- | --- | --- |"]  # fmt: skip
    for found in families.values():
        for record in found:
            if any(n not in record.properties for n in LEADING):
                continue
            for name in LEADING:
                block = record.properties[name][0]
                if block.grade not in ("reference", "measured"):
                    why = block.reasons.get("single_reason", "") or block.reasons.get("note", "")
                    lines.append(
                        f"| {record.name} | {name.replace('_', ' ')} | {block.grade} | {why} |"
                    )
    lines += ["", "## Wanted, and not in the database", ""]
    lines += [f"- **{name}**: {why}" for name, why in notes["wanted"].items()]
    lines += ["", "## Secondary properties", "",
              "| property | liquids that have it | of |", "| --- | --- | --- |"]  # fmt: skip
    everything = [record for found in families.values() for record in found]
    for name in PROPERTIES[3:]:
        have = sum(name in record.properties for record in everything)
        lines.append(f"| {name.replace('_', ' ')} | {have} | {len(everything)} |")
    lines += ["", "## Mixtures", ""]
    lines += [f"- **{name}**: {why}" for name, why in notes["mixtures"].items()]
    return "\n".join(lines) + "\n"


def picture(record: LiquidRecord) -> bytes:
    """Density, viscosity and surface tension with their points, small and in few colours."""
    from matplotlib import pyplot
    from PIL import Image

    figure, axes = pyplot.subplots(1, 3, figsize=(9.0, 2.5), dpi=80)
    for ax, name in zip(axes, LEADING, strict=True):
        try:
            dk.plots.property_over_temperature(record.key, property=name, ax=ax)
        except DropkitError:
            ax.axis("off")
            ax.text(0.5, 0.5, f"{name.replace('_', ' ')}:\nnot seen", ha="center", va="center")
            continue
        handles, labels = ax.get_legend_handles_labels()
        ax.legend(handles[1:6], labels[1:6], fontsize=5, frameon=False)
        ax.tick_params(labelsize=7)
        ax.xaxis.label.set_size(7)
        ax.yaxis.label.set_size(7)
        if name == "viscosity":
            ax.set_yscale("log")
    figure.tight_layout(pad=0.4)
    drawn = io.BytesIO()
    figure.savefig(drawn, format="png")
    pyplot.close(figure)
    small = io.BytesIO()
    Image.open(drawn).convert("RGB").quantize(16).save(small, format="png", optimize=True)
    return small.getvalue()


def pages() -> dict[str, str]:
    """Name of each page and its text."""
    families = by_family()
    found = {page_name(family): page(family, liquids) for family, liquids in families.items()}
    return found | {"README.md": overview(families), "missing.md": missing(families)}


def main(arguments: list[str]) -> None:
    warnings.simplefilter("ignore")
    written = pages()
    for old in HERE.glob("*.md"):
        if old.name not in written:
            old.unlink()
    for name, text in written.items():
        (HERE / name).write_text(text, encoding="utf-8")
    if "--no-pictures" in arguments:
        return
    import matplotlib

    matplotlib.use("Agg")
    PICTURES.mkdir(exist_ok=True)
    for found in by_family().values():
        for record in found:
            if any(name in record.properties for name in LEADING):
                (PICTURES / f"{record.key}.png").write_bytes(picture(record))


if __name__ == "__main__":
    main(sys.argv[1:])
