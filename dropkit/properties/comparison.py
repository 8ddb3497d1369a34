"""Liquids and mixtures side by side."""

from __future__ import annotations

from collections.abc import Sequence
from typing import TYPE_CHECKING, Any

import numpy as np

from dropkit import units
from dropkit.errors import BadInput, MissingProperty
from dropkit.properties import display
from dropkit.properties.interface import Fluid
from dropkit.properties.property_words import PROPERTIES, property_names
from dropkit.properties.pure import liquid
from dropkit.validity import Outside, check_outside

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["compare"]


def compare(
    *fluids: Any,
    at: Any,
    properties: Sequence[str] | None = None,
    outside: Outside = "nan",
) -> pd.DataFrame:
    """Properties of several liquids side by side at one temperature.

    Parameters
    ----------
    *fluids : str or Fluid
        Names of liquids, or liquids, mixtures and users' fluids.
    at : temperature
        One temperature [K]; with a unit, values come in the trade's units.
    properties : sequence of str, optional
        Which ones; by default all that any of the fluids has.
    outside : {"raise", "warn", "nan", "allow"}
        What happens where a value is out of range.

    Returns
    -------
    pandas.DataFrame
        One row per property, with its unit; for each fluid its value, its 95 %
        uncertainty and its grade. What a fluid lacks is NaN with grade
        "missing", what lies outside a range NaN with "out of range".

    Raises
    ------
    BadInput
        No fluid, or an array of temperatures or compositions.
    UnknownName
        A liquid or property that is not known.

    Examples
    --------
    >>> import dropkit as dk
    >>> table = dk.compare("water", "ethanol", at="25 degC", properties=["viscosity"])
    >>> table["water"]["grade"].iloc[0]
    'reference'
    """
    import pandas as pd

    check_outside(outside)
    if not fluids:
        raise BadInput("compare has nothing to compare", allowed="names of liquids, or fluids")
    items = [item if isinstance(item, Fluid) else liquid(item) for item in fluids]
    kelvin = units.single(at, "temperature", "at", plausible=True)
    asked = units.read(at, "temperature", "at")[1]
    if any(item._shape() != () for item in items):
        raise BadInput("compare takes one composition of each fluid")
    if properties is None:
        held = {prop for item in items for prop in item.available()}
        chosen = [prop for prop in PROPERTIES if prop in held]
    else:
        chosen = property_names(properties)
    with_units = asked is not None
    columns: dict[tuple[str, str], list[Any]] = {}
    for number, item in enumerate(items):
        label = item.name
        if any(other.name == label for other in items[:number]):
            label = f"{label} ({number + 1})"
        columns[label, "value"] = []
        columns[label, "95 %"] = []
        columns[label, "grade"] = []
        for prop in chosen:
            try:
                value = item._evaluate(prop, kelvin, outside)
                trail = item._trail(prop, kelvin)
                item._warn_if_recalled(prop)
            except MissingProperty:
                value, spread, grade = np.nan, np.nan, "missing"
            else:
                value = display.in_stock(prop, value) if with_units else value
                spread = np.nan if trail.uncertainty is None else 2.0 * trail.uncertainty * value
                grade = trail.grade if value == value else "out of range"
            columns[label, "value"].append(value)
            columns[label, "95 %"].append(spread)
            columns[label, "grade"].append(grade)
    rows = [f"{prop} [{display.unit_of(prop, with_units=with_units)}]" for prop in chosen]
    return pd.DataFrame(columns, index=pd.Index(rows, name="property"))
