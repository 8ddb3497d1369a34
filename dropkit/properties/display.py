"""How liquids, mixtures, states and results show themselves: plain text and its HTML twin."""

from __future__ import annotations

from collections.abc import Iterable, Sequence
from typing import TYPE_CHECKING, Any, Final, TypeAlias

import numpy as np

from dropkit.properties.property_words import GRADED
from dropkit.unit_table import KINDS, NOMENCLATURE, Kind

if TYPE_CHECKING:
    from dropkit.properties.interface import Fluid
    from dropkit.provenance import Trail

__all__ = [
    "escape",
    "fluid_html",
    "fluid_text",
    "html_table",
    "in_stock",
    "number",
    "text_table",
    "unit_of",
]

Row: TypeAlias = "tuple[str, ...]"

ROOM = 293.15


def escape(text: str) -> str:
    """Text for HTML."""
    # Imported here: its table of entities costs more than a look-up.
    from html import escape as escaped

    return escaped(text)


def _kind(word: str) -> Kind:
    return KINDS[NOMENCLATURE.get(word, word)]


def unit_of(kind: str, *, with_units: bool = True) -> str:
    """The unit in which values of a kind are shown: the trade's, or SI."""
    entry = _kind(kind)
    unit = entry.stock if with_units else entry.si
    return unit.replace("^", "") if unit not in ("", "1", "dimensionless") else "-"


def in_stock(kind: str, value: Any) -> Any:
    """An SI value in the trade's unit of its kind (not for temperatures)."""
    return value / _kind(kind).per_stock


def number(value: Any, figures: int = 4) -> str:
    """A number with a few significant figures, or the span of an array."""
    array = np.asarray(value, dtype=float)
    if array.ndim == 0:
        return f"{float(array):.{figures}g}"
    if not np.isfinite(array).any():
        return f"NaN, shape {array.shape}"
    low, high = np.nanmin(array), np.nanmax(array)
    return f"{low:.{figures}g} ... {high:.{figures}g}, shape {array.shape}"


def text_table(header: Sequence[str], rows: Iterable[Sequence[str]]) -> str:
    """Columns padded to their widest entry."""
    lines = [tuple(header), *(tuple(row) for row in rows)]
    widths = [max(len(line[i]) for line in lines) for i in range(len(header))]
    return "\n".join(
        "  ".join(cell.ljust(width) for cell, width in zip(line, widths, strict=True)).rstrip()
        for line in lines
    )


def html_table(header: Sequence[str], rows: Iterable[Sequence[str]], caption: str = "") -> str:
    """The same table as HTML."""
    head = "".join(f"<th>{escape(cell)}</th>" for cell in header)
    body = "".join(
        "<tr>" + "".join(f"<td>{escape(cell)}</td>" for cell in row) + "</tr>" for row in rows
    )
    title = f"<caption>{escape(caption)}</caption>" if caption else ""
    return f"<table>{title}<thead><tr>{head}</tr></thead><tbody>{body}</tbody></table>"


_HEADER = ("property", "at 20 degC", "unit", "grade", "range")


def _fluid_rows(fluid: Fluid) -> list[tuple[str, ...]]:
    rows: list[tuple[str, ...]] = []
    for prop in GRADED:
        if prop not in fluid.available():
            rows.append((prop, "none", "", "", str(fluid._missing(prop))))
    for prop in fluid.available():
        limits = fluid.range(prop)
        # At room temperature; a narrow range elsewhere in its middle, and told so.
        kelvin = ROOM
        if not limits.covers(ROOM) and limits.high - limits.low < 10.0:
            kelvin = 0.5 * (limits.low + limits.high)
        inside = limits.covers(kelvin)
        value = fluid._evaluate(prop, kelvin, "nan") if inside else None
        shown = "" if value is None else number(in_stock(prop, value))
        if inside and kelvin != ROOM:
            shown += f" at {kelvin - 273.15:.4g} degC"
        span = f"{limits.low - 273.15:.4g} to {limits.high - 273.15:.4g} degC"
        if limits.high == float("inf"):
            span = "any temperature"
        grade = fluid._trail(prop, kelvin if inside else None).grade
        rows.append((prop, shown, unit_of(prop), grade, span))
    return rows


def fluid_text(fluid: Fluid, title: str) -> str:
    """A liquid or mixture as plain text."""
    return f"{title}\n{text_table(_HEADER, _fluid_rows(fluid))}"


def fluid_html(fluid: Fluid, title: str) -> str:
    """A liquid or mixture as an HTML table with its cautions."""
    notes = "".join(f"<li>{escape(text)}</li>" for text in fluid.cautions)
    return html_table(_HEADER, _fluid_rows(fluid), title) + (f"<ul>{notes}</ul>" if notes else "")


SHEET_COLUMNS: Final = (
    "property", "value", "unit", "95 %", "method", "grade", "sources", "range"
)  # fmt: skip


def sheet_row(prop: str, shown: str, unit: str, trail: Trail | None, reason: str = "") -> Row:
    """A line of a sheet of properties; without a trail, why there is no value."""
    if trail is None:
        short = "out of range" if "out of range" in reason else "not to be had"
        return (prop, short, "", "", reason, "", "", "")
    spread = "" if trail.uncertainty is None else band(trail.uncertainty)
    keys = ", ".join(trail.sources)
    return (prop, shown, unit, spread, trail.method, trail.grade, keys, trail.range)


def band(uncertainty: float) -> str:
    """The 95 % band of a relative standard uncertainty; beyond a half, as a factor."""
    wide = 2.0 * uncertainty
    return f"+-{100 * wide:.2g} %" if wide <= 0.5 else f"factor {1.0 + wide:.2g}"


def sheet_text(title: str, rows: Iterable[Row], cautions: Iterable[str]) -> str:
    """A sheet of properties as plain text: the short columns, and the cautions below."""
    short = [(*row[:4], row[5]) for row in rows]
    table = text_table((*SHEET_COLUMNS[:4], "grade"), short)
    return "\n".join([title, table, *(f"caution: {text}" for text in cautions)])


def sheet_html(title: str, rows: Iterable[Row], cautions: Iterable[str]) -> str:
    """A sheet of properties as HTML: all columns, and the cautions below."""
    notes = "".join(f"<li>{escape(text)}</li>" for text in cautions)
    table = html_table(SHEET_COLUMNS, rows, title)
    return table + (f"<ul>{notes}</ul>" if notes else "")
