"""How a stream shows itself: tables, text and HTML."""

from __future__ import annotations

import math
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit.design.stream_given import INPUTS
from dropkit.design.stream_quantities import QUANTITIES
from dropkit.properties import display
from dropkit.unit_table import kind_of

if TYPE_CHECKING:
    import pandas as pd

    from dropkit.design.stream_result import Stream

__all__ = ["criteria_frame", "html", "quantity_frame", "report", "text"]

_LEADING: Final = (
    "drop_diameter", "frequency", "velocity", "jet_diameter", "wavelength_ratio",
    "nozzle_diameter", "nozzle_length", "gauge_pressure", "flow", "total_flow", "breakup_length",
)  # fmt: skip
_COLUMNS: Final = ("quantity", "value", "unit", "meaning")
_JUDGED: Final = ("criterion", "value", "limit", "margin", "verdict")


def shown(stream: Stream, kind: str, value: Any) -> str:
    """A value as text in the unit that was asked for."""
    name = kind_of(kind)[0].name
    if not np.any(np.isfinite(value)):
        return "undetermined"
    number = np.asarray(display.in_stock(name, value) if stream.has_units else value)
    finite = number[np.isfinite(number)]
    low, high = display.number(finite.min()), display.number(finite.max())
    return low if low == high else f"{low} to {high}"


def unit(stream: Stream, kind: str) -> str:
    """The unit of a kind in the way that was asked for."""
    return display.unit_of(kind_of(kind)[0].name, with_units=stream.has_units)


def quantity_frame(stream: Stream) -> pd.DataFrame:
    """One row per quantity."""
    import pandas as pd

    rows = []
    for word, (kind, meaning) in QUANTITIES.items():
        value = stream.value(word)
        stock = display.in_stock(kind, value) if stream.has_units else value
        rows.append((word, stock, unit(stream, kind), stream.origin(word), meaning))
    columns = ["quantity", "value", "unit", "origin", "meaning"]
    return pd.DataFrame(rows, columns=columns).set_index("quantity")


def criteria_frame(stream: Stream) -> pd.DataFrame:
    """One row per criterion."""
    import pandas as pd

    rows = []
    for each in stream.judged:
        per = kind_of(each.kind)[0].per_stock if stream.has_units else 1.0
        rows.append(
            {
                "criterion": each.name,
                "value": stream.shaped(np.asarray(each.value) / per),
                "low": stream.shaped(np.asarray(each.low) / per),
                "high": stream.shaped(np.asarray(each.high) / per),
                "unit": unit(stream, each.kind),
                "margin": stream.shaped(each.margin),
                "met": stream.shaped(each.met),
                "verdict": stream.shaped(each.verdict),
                "source": each.source,
                "note": each.note,
            }
        )
    return pd.DataFrame(rows).set_index("criterion")


def _rows(stream: Stream, words: Any) -> list[tuple[str, ...]]:
    rows: list[tuple[str, ...]] = []
    for word in words:
        kind, meaning = QUANTITIES[word]
        rows.append((word, shown(stream, kind, stream.value(word)), unit(stream, kind), meaning))
    return rows


def _limit(stream: Stream, each: Any) -> str:
    low, high = stream.shaped(each.low), stream.shaped(each.high)
    parts = []
    if np.any(np.isfinite(low)):
        parts.append(f">= {shown(stream, each.kind, low)}")
    if np.any(np.isfinite(high)):
        parts.append(f"<= {shown(stream, each.kind, high)}")
    return " and ".join(parts)


def _judged_rows(stream: Stream) -> list[tuple[str, ...]]:
    rows: list[tuple[str, ...]] = []
    for each in stream.judged:
        value = shown(stream, each.kind, stream.shaped(each.value))
        sign = unit(stream, each.kind)
        margin = stream.shaped(each.margin)
        spread = "" if np.all(np.isnan(margin)) else f"{100.0 * np.nanmin(margin):.2g} %"
        rows.append(
            (each.name, f"{value} {'' if sign == '-' else sign}".strip(), _limit(stream, each),
             spread, _verdict(stream, each))
        )  # fmt: skip
    return rows


def _verdict(stream: Stream, each: Any) -> str:
    verdict = stream.shaped(each.verdict)
    if isinstance(verdict, str):
        return verdict
    values, counts = np.unique(verdict.astype(str), return_counts=True)
    return ", ".join(f"{count} x {value}" for value, count in zip(values, counts, strict=True))


def title(stream: Stream) -> str:
    """What is jetted, and how many designs."""
    state = stream.state
    celsius = display.number(np.asarray(state.si().temperature) - 273.15, 4)
    many = f", {math.prod(stream.shape)} designs" if stream.shape else ""
    return f"stream of {state.name} at {celsius} degC{many}"


def text(stream: Stream) -> str:
    """The short form: leading quantities, criteria that are not met, cautions."""
    rows = [row[:3] for row in _rows(stream, _LEADING)]
    lines = [title(stream), display.text_table(_COLUMNS[:3], rows)]
    open_ones = [row for row, each in zip(_judged_rows(stream), stream.judged, strict=True)
                 if np.any(np.asarray(each.met) < 1.0)]  # fmt: skip
    lines += [f"{row[0]}: {row[4]} ({row[1]}; limit {row[2]})" for row in open_ones]
    lines += _reason_lines(stream)
    lines += [f"assumed {note}" for note in stream.assumptions]
    lines += [f"caution: {note}" for note in stream.cautions]
    return "\n".join(lines)


def _reason_lines(stream: Stream) -> list[str]:
    reasons, counts = np.unique(
        np.asarray(stream.reasons, dtype=object).astype(str), return_counts=True
    )
    return [f"refused: {reason} ({count} of {stream.reasons.size})"
            for reason, count in zip(reasons, counts, strict=True) if reason]  # fmt: skip


def html(stream: Stream) -> str:
    """The same as HTML with all criteria."""
    table = display.html_table(_COLUMNS, _rows(stream, QUANTITIES), title(stream))
    judged = display.html_table(_JUDGED, _judged_rows(stream), "criteria")
    notes = [*_reason_lines(stream), *(f"assumed {note}" for note in stream.assumptions),
             *(f"caution: {note}" for note in stream.cautions)]  # fmt: skip
    return (
        table + judged + "<ul>" + "".join(f"<li>{display.escape(x)}</li>" for x in notes) + "</ul>"
    )


def report(stream: Stream) -> str:
    """Everything that an engineer files, as plain text."""
    from dropkit.provenance import cite

    given = []
    for word, value in stream.inputs.items():
        kind = INPUTS[word]
        given.append((word, shown(stream, kind, value), unit(stream, kind)))
    liquid = stream.state.with_units() if stream.has_units else stream.state.si()
    sections = [
        title(stream)[0].upper() + title(stream)[1:],
        _section("Given", display.text_table(("input", "value", "unit"), given)),
        _section("Assumed", _listed(stream.assumptions)),
        _section("Liquid", repr(liquid)),
        _section("Stream", display.text_table(_COLUMNS, _rows(stream, QUANTITIES))),
        _section("Criteria", display.text_table(_JUDGED, _judged_rows(stream))),
        _section(
            "Criteria: sources and notes",
            _listed(f"{e.name}: {e.source}{'; ' * bool(e.note)}{e.note}" for e in stream.judged),
        ),
        _section("Refused", "\n".join(_reason_lines(stream)) or "none"),
        _section("Undetermined", ", ".join(stream.undetermined) or "nothing"),
        _section("Cautions", _listed(stream.cautions)),
        _section("Sources", cite(stream)),
    ]
    return "\n\n".join(sections) + "\n"


def _section(head: str, body: str) -> str:
    return f"{head}\n{'-' * len(head)}\n{body}"


def _listed(lines: Any) -> str:
    return "\n".join(f"- {line}" for line in lines) or "none"
