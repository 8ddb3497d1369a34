"""Whole tables at once: `lookup` over a frame of compositions and temperatures, and `grid`."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from typing import TYPE_CHECKING, Any

import numpy as np

from dropkit import units
from dropkit.errors import (
    BadInput,
    CompositionError,
    MissingProperty,
)
from dropkit.properties import display
from dropkit.properties.composition import (
    check_basis,
    read_composition,
)
from dropkit.properties.curves import FloatArray
from dropkit.properties.frame_reading import Table, tell
from dropkit.properties.mixtures import Mixture
from dropkit.properties.other_chemicals import key_of
from dropkit.properties.property_words import GRADED, KELVIN_HINT, property_names
from dropkit.provenance import GRADES
from dropkit.validity import Outside, check_outside

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["grid", "lookup"]


def lookup(
    frame: pd.DataFrame,
    properties: Sequence[str] = GRADED,
    *,
    by: str | None = None,
    rest: str | None = None,
    outside: Outside = "nan",
) -> pd.DataFrame:
    """Properties for every row of a frame of compositions and temperatures.

    Parameters
    ----------
    frame : pandas.DataFrame
        A column ``temperature`` (or ``T``), and either a column ``liquid`` with names or
        one column per component. Units stand in brackets in the header, as in
        ``"temperature [degC]"`` or ``"glycerol [wt%]"``; without one a column is SI and a
        fraction. Other columns are kept and left alone.
    properties : sequence of str
        Which properties; by default density, viscosity and surface tension.
    by : {"mass", "mole", "volume"}, optional
        Basis of fractions, unless the headers say it (wt%, mol%, vol%).
    rest : str, optional
        A component without a column that makes up the rest.
    outside : {"nan", "raise", "warn", "allow"}
        What happens out of range; by default NaN with the reason.

    Returns
    -------
    pandas.DataFrame
        The frame with one column per property (unit in its header: the trade's where the
        temperature carries a unit, SI otherwise), ``grade`` (the worst of the row) and
        ``reason`` (empty where all is well).

    Raises
    ------
    BadInput
        No temperature column, no composition, or text where numbers belong.
    UnknownName
        A header that looks like a misspelt component.

    Examples
    --------
    >>> import dropkit as dk, pandas as pd
    >>> batch = pd.DataFrame({"temperature [degC]": [20, 30], "glycerol [wt%]": [20, 40]})
    >>> list(dk.lookup(batch, ["density"], rest="water").columns)[-3:]
    ['density [kg/m3]', 'grade', 'reason']
    """
    import pandas as pd

    check_outside(outside)
    if not isinstance(frame, pd.DataFrame):
        raise BadInput(f"lookup takes a DataFrame, not {type(frame).__name__}")
    wanted = property_names(properties)
    doubled = frame.columns[frame.columns.duplicated()]
    if len(doubled):
        raise BadInput(f"The frame has two columns {doubled[0]!r}", allowed="one of each name")
    table = Table(frame, by, rest)
    headers = {
        prop: f"{prop} [{display.unit_of(prop, with_units=table.with_units)}]" for prop in wanted
    }
    for header in (*headers.values(), "grade", "reason"):
        if header in frame.columns:
            raise BadInput(
                f"The frame has a column {header!r} already, where the result would go",
                hint="Rename it: what you measured is not overwritten",
            )
    size = len(frame)
    values = {prop: np.full(size, np.nan) for prop in wanted}
    grades = np.full(size, "", dtype=object)
    for rows, fluid in table.groups():
        _fill_group(rows, fluid, table, wanted, outside, values, grades)
    result = frame.copy()
    for prop in wanted:
        shown = display.in_stock(prop, values[prop]) if table.with_units else values[prop]
        result[headers[prop]] = shown
    result["grade"] = grades
    result["reason"] = table.reasons
    return result


def _fill_group(
    rows: FloatArray,
    fluid: Mixture,
    table: Table,
    wanted: Sequence[str],
    outside: Outside,
    values: Mapping[str, FloatArray],
    grades: Any,
) -> None:
    kelvin, reasons, with_units = table.temperature[rows], table.reasons, table.with_units
    codes = np.full(rows.size, -1)
    for prop in wanted:
        try:
            got = np.asarray(fluid._evaluate(prop, kelvin, outside))
            limits = fluid._range(prop)
        except MissingProperty as problem:
            tell(reasons, rows, str(problem))
            continue
        fluid._warn_if_recalled(prop)
        values[prop][rows] = got
        lost = np.isnan(got)
        codes = np.maximum(codes, np.where(lost, -1, fluid.grade_codes(prop, kelvin)))
        hot = ~np.asarray(limits.holds(kelvin))
        mixed = np.broadcast_to(fluid._settle_point(prop, kelvin, "nan"), kelvin.shape)
        tell(reasons, rows[~lost & hot], f"{prop}: extrapolated, outside {limits}")
        apart = "no record holds this composition at this temperature"
        tell(reasons, rows[~lost & ~hot & mixed], f"{prop}: extrapolated, {apart}")
        if lost.any():
            inside = np.asarray(limits.holds(kelvin))
            tell(reasons, rows[lost & inside], f"{prop}: out of range, {apart}")
            cold = lost & ~inside & (kelvin < 150.0) & (not with_units)
            tell(reasons, rows[lost & ~inside & ~cold], f"{prop}: temperature outside {limits}")
            tell(reasons, rows[cold], f"{prop}: temperature outside {limits}; {KELVIN_HINT}")
    # A grade belongs to what was given; a row without a value has none.
    grades[rows] = np.array([*GRADES, ""], dtype=object)[codes]


def grid(
    components: Mapping[str, Any],
    temperature: Any,
    properties: Sequence[str] = GRADED,
    *,
    by: str | None = None,
    outside: Outside = "nan",
) -> pd.DataFrame:
    """Properties over the outer grid of compositions and temperatures.

    Parameters
    ----------
    components : mapping
        Fractions by component: numbers, sequences of numbers, or ``"rest"``. Every
        combination of the sequences is taken.
    temperature : sequence
        Temperatures [K, or with a unit].
    properties : sequence of str
        Which properties; by default density, viscosity and surface tension.
    by : {"mass", "mole", "volume"}
        Basis of the fractions.
    outside : {"nan", "raise", "warn", "allow"}
        What happens out of range; by default NaN with the reason.

    Returns
    -------
    pandas.DataFrame
        Indexed by the varied fractions and the temperature, with a column per property,
        ``grade`` and ``reason``; ``.unstack()`` turns one property into a matrix.

    Raises
    ------
    BasisMissing, CompositionError, UnknownName
        As `mixture` does.

    Examples
    --------
    >>> import dropkit as dk
    >>> table = dk.grid(
    ...     {"glycerol": [0.1, 0.3], "water": "rest"}, [293.15, 303.15], ["viscosity"], by="mass"
    ... )
    >>> table["viscosity [Pa*s]"].unstack().shape
    (2, 2)
    """
    import pandas as pd

    if by is None or not isinstance(components, Mapping):
        read_composition(components, by=by)  # raises in the same words
    check_basis(by)
    kelvin, asked = units.read(temperature, "temperature", "temperature")
    axes: dict[str, list[float]] = {}
    rest = None
    for name, value in components.items():
        key = key_of(name)
        if key in axes or key == rest:
            raise CompositionError(f"{key} appears twice, under two of its names")
        if isinstance(value, str) and value.strip().casefold() == "rest":
            if rest is not None:
                raise CompositionError(f"Both {rest} and {key} are 'rest'", allowed="one of them")
            rest = key
            continue
        numbers = np.atleast_1d(np.asarray(units.to_si(value, "ratio", f"fraction of {key}")))
        axes[key] = [float(x) for x in numbers.reshape(-1)]
    if not axes:
        raise BadInput(
            "grid has nothing to vary but the temperature",
            allowed="fractions of at least one component",
            hint="For one liquid ask it with an array of temperatures",
        )
    varied = [key for key, numbers in axes.items() if len(numbers) > 1]
    header = "temperature [degC]" if asked is not None else "temperature"
    flat = np.atleast_1d(np.asarray(kelvin, dtype=float)).reshape(-1)
    shown = flat - 273.15 if asked is not None else flat
    mesh = np.meshgrid(*axes.values(), shown, indexing="ij")
    frame = pd.DataFrame(dict(zip((*axes, header), map(np.ravel, mesh), strict=True)))
    result = lookup(frame, properties, by=by, rest=rest, outside=outside)
    fixed = [key for key in axes if key not in varied]
    return result.drop(columns=fixed).set_index([*varied, header])
