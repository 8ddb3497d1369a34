"""`streams`: a whole table of designs at once, impossible rows marked with the reason."""

from __future__ import annotations

import re
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit import units
from dropkit.design.stream_design import designed, state_of
from dropkit.design.stream_given import AMPLITUDES, INPUTS
from dropkit.design.stream_quantities import QUANTITIES
from dropkit.design.stream_solver import FACTS
from dropkit.errors import BadInput, DropkitError, UnknownName, nearest
from dropkit.properties import display
from dropkit.unit_table import kind_of

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["streams"]

_HEADER: Final = re.compile(r"^\s*(?P<name>.+?)\s*[\[(]\s*(?P<unit>[^\[\]()]+?)\s*[\])]\s*$")
# Columns that may be empty in some rows, which then leave them free.
_OPTIONAL: Final = (*FACTS, "drop_diameter", "drop_rate", "total_flow", "mass_flow",
                    "nozzle_length", "contraction", "discharge_coefficient", *AMPLITUDES)  # fmt: skip


def streams(
    frame: pd.DataFrame,
    fluid: Any,
    temperature: Any = None,
    *,
    nozzle_kind: str = "tube",
    **common: Any,
) -> pd.DataFrame:
    """Design one stream per row of a table.

    Holds as `stream` does. A cell without a number leaves its quantity free in that row.

    Parameters
    ----------
    frame : pandas.DataFrame
        Columns named as the inputs of `stream`, and ``temperature``; units stand in brackets in
        the header, as in ``"drop_diameter [um]"``, and without one a column is SI. Other columns
        are kept and left alone, unless their name is nearly that of an input.
    fluid : Fluid, State or str
        What is jetted in every row.
    temperature : float or with a unit, optional
        Where the table has no such column [K].
    nozzle_kind : {"tube", "hole", "plate"}, keyword-only
        As `stream` takes it.
    **common : float or with a unit
        Inputs of `stream` that are the same for all rows.

    Returns
    -------
    pandas.DataFrame
        The table's own columns, then the quantities that follow (with units in the header if one
        of the table's had one), ``feasible``, ``margin`` and ``reason``.

    Raises
    ------
    BadInput, UnknownName
        For text in a column, an input given twice, and a column nearly named as an input.

    Examples
    --------
    >>> import pandas as pd
    >>> from dropkit.design import streams
    >>> wanted = pd.DataFrame({"drop_diameter [um]": [60, 100], "frequency [kHz]": [50, 20]})
    >>> found = streams(wanted, "water", "20 degC")
    >>> print([f"{speed:.1f}" for speed in found["velocity [m/s]"]])
    ['7.2', '4.8']
    """
    columns, kelvin, with_units, reasons = _read(frame)
    fixed: dict[str, Any] = {}
    asked: units.Asked | None = None
    for word, value in common.items():
        if word not in INPUTS:
            raise UnknownName(f"stream knows no {word!r}", choices=nearest(word, INPUTS))
        if word in columns:
            raise BadInput(f"{word} is given twice, as a column and for all rows")
        kind, domain = kind_of(INPUTS[word])
        fixed[word], its = units.read(value, kind, word, domain=domain)
        asked = asked or its
    if kelvin is not None and temperature is not None:
        raise BadInput("temperature is given twice, as a column and for all rows")
    n = len(frame)
    found = {word: np.full(n, np.nan) for word in QUANTITIES}
    feasible, margin = np.full(n, False), np.full(n, np.nan)
    open_rows = np.flatnonzero(reasons == "")
    names = list(columns)
    code = np.zeros(len(open_rows), dtype=np.int64)
    for bit, column in enumerate(columns.values()):
        code |= (~np.isnan(column[open_rows])).astype(np.int64) << bit
    for which in np.unique(code):
        rows = open_rows[code == which]
        filled = [bool(which >> bit & 1) for bit in range(len(names))]
        given = {w: columns[w][rows] for w, full in zip(names, filled, strict=True) if full}
        needed = [word for word, full in zip(names, filled, strict=True) if not full]
        missing = [word for word in needed if word not in _OPTIONAL]
        if missing:
            reasons[rows] = f"{missing[0]} is missing"
            continue
        try:
            state = state_of(fluid, temperature if kelvin is None else kelvin[rows], "nan").si()
            options = {"nozzle_kind": nozzle_kind, "outside": "nan"}
            group = designed(state, {**fixed, **given}, options, None, shape=(len(rows),))
        except DropkitError as problem:
            reasons[rows] = str(problem)
            continue
        for word, value in group.found.items():
            found[word][rows] = value
        feasible[rows], margin[rows] = np.ravel(group.feasible), np.ravel(group.margin)
        told = group.reasons.copy()
        lost = np.isnan(group.found["velocity"]) & (told == "")
        cold = lost & np.isnan(np.broadcast_to(group._case.liquid.density, lost.shape))
        told[lost] = "undetermined: the row gives too few facts"
        told[cold] = "the liquid's properties are out of range at this temperature"
        reasons[rows] = told
        feasible[rows] &= told == ""
    return _joined(frame, columns, found, feasible, margin, reasons, with_units or asked)


def _read(frame: pd.DataFrame) -> tuple[dict[str, Any], Any, bool, Any]:
    """Columns in SI, temperatures, whether a header had a unit, and reasons of bad rows."""
    columns: dict[str, Any] = {}
    kelvin, with_units = None, False
    reasons = np.full(len(frame), "", dtype=object)
    for header in frame.columns:
        match = _HEADER.match(str(header))
        name, unit = (match["name"], match["unit"]) if match else (str(header).strip(), None)
        if name != "temperature" and name not in INPUTS:
            close = nearest(name, INPUTS, 1)
            if close and name.casefold().replace(" ", "_") != name:
                close = nearest(name.casefold().replace(" ", "_"), INPUTS, 1) or close
            if close and _alike(name, close[0]):
                raise UnknownName(
                    f"The column {name!r} is no input of a stream",
                    choices=close,
                    hint="Rename the column if it is meant as something else",
                )
            continue
        if name in columns or (name == "temperature" and kelvin is not None):
            raise BadInput(f"the table has two columns {name!r}")
        values = frame[header].to_numpy()
        kind, domain = kind_of(INPUTS.get(name, "temperature"))
        si, asked = units.read(values if unit is None else (values, unit), kind, name, domain="any")
        with_units = with_units or asked is not None
        si = np.array(si, dtype=float)
        bad = si < 0.0 if domain == ">= 0" else si <= 0.0
        for text, where in ((f"{name} is not positive", bad),):
            reasons[where & (reasons == "")] = text
        if name == "temperature":
            kelvin = si
            reasons[np.isnan(si) & (reasons == "")] = "temperature is missing"
        else:
            columns[name] = si
    return columns, kelvin, with_units, reasons


def _alike(name: str, other: str) -> bool:
    from difflib import SequenceMatcher

    return SequenceMatcher(None, name.casefold(), other).ratio() > 0.85


def _joined(
    frame: pd.DataFrame,
    columns: dict[str, Any],
    found: dict[str, Any],
    feasible: Any,
    margin: Any,
    reasons: Any,
    with_units: Any,
) -> pd.DataFrame:
    """The table with its results."""
    import pandas as pd

    table = {}
    for word, value in found.items():
        if word in columns and not np.isnan(columns[word]).any():
            continue
        kind = QUANTITIES[word][0]
        sign = display.unit_of(kind, with_units=bool(with_units))
        head = word if sign == "-" or not with_units else f"{word} [{sign}]"
        head = f"{head} found" if head in frame.columns else head
        table[head] = display.in_stock(kind, value) if with_units else value
    table.update(feasible=feasible, margin=margin, reason=reasons)
    return pd.concat([frame, pd.DataFrame(table, index=frame.index)], axis=1)
