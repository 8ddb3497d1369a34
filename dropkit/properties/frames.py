"""Whole tables at once: `lookup` over a frame of compositions and temperatures, and `grid`."""

from __future__ import annotations

import re
from collections.abc import Iterable, Mapping, Sequence
from itertools import product
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit import records, units
from dropkit.errors import (
    BadInput,
    CompositionError,
    DropkitError,
    MissingProperty,
    UnknownName,
    nearest,
)
from dropkit.properties import display
from dropkit.properties.catalogue import resolve
from dropkit.properties.composition import (
    BASES,
    Composition,
    check_basis,
    read_composition,
    to_mass,
)
from dropkit.properties.curves import FloatArray
from dropkit.properties.interface import GRADED, property_name
from dropkit.properties.mixtures import Mixture
from dropkit.provenance import GRADES
from dropkit.validity import Outside, check_outside

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["grid", "lookup"]

_HEADER: Final = re.compile(r"^\s*(?P<name>.+?)\s*[\[(]\s*(?P<unit>[^\[\]()]+?)\s*[\])]\s*$")
_TEMPERATURE: Final = ("temperature", "t")
# Units of a header that fix the basis of a fraction.
_PERCENT: Final = {
    "%": None, "wt%": "mass", "wt %": "mass", "mass%": "mass", "mass %": "mass", "%w/w": "mass",
    "mol%": "mole", "mol %": "mole", "vol%": "volume", "vol %": "volume", "%v/v": "volume",
}  # fmt: skip


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
    wanted = [property_name(prop) for prop in properties]
    table = _Table(frame, by, rest)
    size = len(frame)
    values = {prop: np.full(size, np.nan) for prop in wanted}
    grades = np.full(size, "", dtype=object)
    reasons = table.reasons
    for rows, fluid in table.groups():
        _fill_group(rows, fluid, table.temperature, wanted, outside, values, grades, reasons)
    result = frame.copy()
    for prop in wanted:
        shown = display.in_stock(prop, values[prop]) if table.with_units else values[prop]
        unit = display.unit_of(prop, with_units=table.with_units)
        result[f"{prop} [{unit}]"] = shown
    result["grade"] = grades
    result["reason"] = reasons
    return result


def _fill_group(
    rows: FloatArray,
    fluid: Mixture,
    temperature: FloatArray,
    wanted: Sequence[str],
    outside: Outside,
    values: Mapping[str, FloatArray],
    grades: Any,
    reasons: list[str],
) -> None:
    kelvin = temperature[rows]
    codes = np.zeros(rows.size, dtype=int)
    for prop in wanted:
        try:
            got = np.asarray(fluid._evaluate(prop, kelvin, outside))
            limits = fluid._range(prop)
        except MissingProperty as problem:
            for row in rows:
                reasons[row] = _join(reasons[row], str(problem))
            continue
        values[prop][rows] = got
        codes = np.maximum(codes, fluid.grade_codes(prop, kelvin))
        for row in rows[np.isnan(got)]:
            inside = limits.low <= temperature[row] <= limits.high
            why = "composition out of range" if inside else f"temperature outside {limits}"
            reasons[row] = _join(reasons[row], f"{prop}: {why}")
    grades[rows] = np.array(GRADES, dtype=object)[codes]


def _join(before: str, more: str) -> str:
    return f"{before}; {more}" if before else more


class _Table:
    """A frame read column by column: temperatures, mass fractions, and rows that can't be used."""

    def __init__(self, frame: pd.DataFrame, by: str | None, rest: str | None) -> None:
        if by is not None:
            check_basis(by)
        self.size = len(frame)
        self.reasons = [""] * self.size
        self.with_units = False
        self.temperature = np.full(self.size, np.nan)
        self.keys: list[str] = []
        self.mass: list[FloatArray] = []
        self._names: list[Any] | None = None
        columns: dict[str, tuple[FloatArray, str | None]] = {}
        seen_temperature = False
        for header in frame.columns:
            name, unit = _split(header)
            if name.casefold() in _TEMPERATURE:
                if seen_temperature:
                    raise BadInput("The frame has two temperature columns")
                seen_temperature = True
                self._read_temperature(frame[header], unit)
            elif name.casefold() == "liquid":
                self._names = list(frame[header])
            else:
                key = _component(name, unit)
                if key is None:
                    continue
                if key in columns:
                    raise CompositionError(f"{key} has two columns")
                columns[key] = (_numbers(frame[header], header), unit)
        if not seen_temperature:
            raise BadInput(
                "The frame has no temperature column",
                allowed="a column 'temperature' (kelvin) or 'temperature [degC]'",
            )
        if self._names is None and not columns:
            raise BadInput(
                "The frame has neither a column 'liquid' nor columns named by components"
            )
        if self._names is not None and columns:
            raise BadInput("The frame has a column 'liquid' and columns of components")
        if columns:
            self._read_components(columns, by, rest)
        for row in np.flatnonzero(np.isnan(self.temperature)):
            self.reasons[row] = _join(self.reasons[row], "temperature is missing")

    def _read_temperature(self, column: pd.Series[Any], unit: str | None) -> None:
        numbers = _numbers(column, str(column.name))
        if unit is None:
            kelvin = numbers
        else:
            self.with_units = True
            kelvin = np.asarray(
                units.to_si((numbers, unit), "temperature", str(column.name), domain="any")
            )
        for row in np.flatnonzero(kelvin <= 0.0):
            self.reasons[row] = "temperature at or below 0 K"
        self.temperature = np.where(kelvin > 0.0, kelvin, np.nan)

    def _read_components(
        self, columns: Mapping[str, tuple[FloatArray, str | None]], by: str | None, rest: str | None
    ) -> None:
        if rest is not None:
            rest = resolve(rest)
            if rest in columns:
                raise CompositionError(
                    f"{rest} is the rest and has a column", allowed="one of both"
                )
        shares, basis, amounts = _on_one_basis(columns, by)
        keys = list(shares)
        total = sum(shares.values())
        if rest is not None:
            if amounts:
                raise CompositionError("rest= needs fractions, but the columns hold amounts")
            keys.append(rest)
            shares[rest] = 1.0 - total
            total = np.ones(self.size)
        bad = np.zeros(self.size, dtype=bool)
        for key in keys:
            for row in np.flatnonzero(np.isnan(shares[key])):
                self.reasons[row] = _join(self.reasons[row], f"{key} is missing")
            for row in np.flatnonzero(shares[key] < -1e-9):
                self.reasons[row] = _join(self.reasons[row], f"{key} is {shares[key][row]:.4g}")
            bad |= ~(shares[key] >= -1e-9)
        off = np.zeros(self.size, dtype=bool)
        if not amounts:
            off = ~bad & (np.abs(np.asarray(total) - 1.0) > 1e-6)
            for row in np.flatnonzero(off):
                self.reasons[row] = _join(
                    self.reasons[row], f"fractions add up to {np.asarray(total)[row]:.6g}, not 1"
                )
        clean = {key: np.where(bad | off, np.nan, np.maximum(shares[key], 0.0)) for key in keys}
        self.keys = keys
        self.mass = [np.asarray(w, dtype=float) for w in to_mass(keys, list(clean.values()), basis)]

    def groups(self) -> Iterable[tuple[Any, Mixture]]:
        """Rows that share their components, each with one array-valued mixture."""
        if self._names is not None:
            yield from self._pure_groups()
            return
        usable = ~np.isnan(self.mass[0]) & ~np.isnan(self.temperature)
        pattern = np.zeros(self.size, dtype=np.int64)
        for place, w in enumerate(self.mass):
            pattern |= (w > 0.0).astype(np.int64) << place
        for code in np.unique(pattern[usable]):
            rows = np.flatnonzero(usable & (pattern == code))
            chosen = [i for i in range(len(self.keys)) if int(code) >> i & 1]
            keys = tuple(self.keys[i] for i in chosen)
            if all(records.liquid_record(key).kind != "liquid" for key in keys):
                for row in rows:
                    self.reasons[row] = _join(self.reasons[row], "no liquid in it")
                continue
            mass = tuple(self.mass[i][rows] for i in chosen)
            yield rows, Mixture(Composition(keys, mass), estimates="allow", quiet=True)

    def _pure_groups(self) -> Iterable[tuple[Any, Mixture]]:
        assert self._names is not None
        places: dict[Any, list[int]] = {}
        for row, name in enumerate(self._names):
            places.setdefault(name, []).append(row)
        for name, numbers in places.items():
            rows = np.array(numbers)
            rows = rows[~np.isnan(self.temperature[rows])]
            try:
                single = read_composition({name: "rest"}, by="mass")
                fluid = Mixture(single, estimates="allow", quiet=True)
            except DropkitError as problem:
                for row in numbers:
                    self.reasons[row] = _join(self.reasons[row], str(problem))
                continue
            yield rows, fluid


def _split(header: Any) -> tuple[str, str | None]:
    text = str(header)
    match = _HEADER.match(text)
    return (match["name"], match["unit"]) if match else (text.strip(), None)


def _component(name: str, unit: str | None) -> str | None:
    """Record key of a header; None for a column that is no component."""
    try:
        return resolve(name)
    except UnknownName:
        close = nearest(name, records.index())
        fraction_like = unit is not None and unit.casefold() in _PERCENT
        if fraction_like or close:
            raise UnknownName(
                f"The column {name!r} is no component that is known",
                choices=close,
                hint="Rename the column if it is meant as something else",
            ) from None
        return None


def _numbers(column: Any, header: Any) -> FloatArray:
    # Columns of mixed types hide booleans and complex numbers behind "object".
    mixed = column.dtype == object
    odd = any(isinstance(x, bool | np.bool_ | complex) for x in column) if mixed else False
    if odd or column.dtype.kind in "bcmM":
        raise BadInput(f"The column {header!r} holds {column.dtype}", allowed="real numbers")
    try:
        numbers = np.asarray(column, dtype=float)
    except (TypeError, ValueError) as problem:
        raise BadInput(f"The column {header!r} holds text", allowed="numbers") from problem
    if np.isinf(numbers).any():
        raise BadInput(f"The column {header!r} holds infinity", allowed="finite numbers or NaN")
    return numbers


def _on_one_basis(
    columns: Mapping[str, tuple[FloatArray, str | None]], by: str | None
) -> tuple[dict[str, Any], str, bool]:
    """Shares or amounts in SI, their basis, and whether they are amounts."""
    shares: dict[str, Any] = {}
    bases: set[str | None] = set()
    amounts = False
    for key, (numbers, unit) in columns.items():
        if unit is None:
            shares[key] = numbers
            bases.add(None)
        elif unit.casefold() in _PERCENT:
            shares[key] = numbers / 100.0
            bases.add(_PERCENT[unit.casefold()])
        else:
            for kind, basis in (("mass", "mass"), ("volume", "volume"), ("amount", "mole")):
                try:
                    shares[key] = np.asarray(units.to_si((numbers, unit), kind, key, domain="any"))
                except DropkitError:
                    continue
                bases.add(basis)
                amounts = True
                break
            else:
                raise BadInput(
                    f"The column of {key} is in {unit!r}",
                    allowed="%, wt%, mol%, vol%, or a unit of mass, volume or amount",
                )
    stated = {basis for basis in bases if basis is not None}
    if len(stated) > 1 or (amounts and None in bases):
        raise CompositionError("The columns are on different bases", allowed="one for all")
    chosen = stated.pop() if stated else by
    if chosen is None:
        raise CompositionError(
            "The columns don't say their basis", allowed=f"by= one of {', '.join(BASES)}, or wt%"
        )
    if by is not None and by != chosen:
        raise CompositionError(f"by={by!r} contradicts the headers, which are by {chosen}")
    return shares, chosen, amounts


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

    if by is None:
        read_composition(components, by=None)  # raises BasisMissing in the same words
    check_basis(by)
    kelvin, asked = units.read(temperature, "temperature", "temperature")
    axes: dict[str, list[float]] = {}
    rest = None
    for name, value in components.items():
        key = resolve(name)
        if isinstance(value, str) and value.strip().casefold() == "rest":
            rest = key
            continue
        numbers = np.atleast_1d(np.asarray(units.to_si(value, "ratio", f"fraction of {key}")))
        axes[key] = [float(x) for x in numbers.reshape(-1)]
    varied = [key for key, numbers in axes.items() if len(numbers) > 1]
    header = "temperature [degC]" if asked is not None else "temperature"
    flat = np.atleast_1d(np.asarray(kelvin, dtype=float)).reshape(-1)
    shown = flat - 273.15 if asked is not None else flat
    rows = list(product(*axes.values(), shown))
    frame = pd.DataFrame(rows, columns=[*axes, header])
    result = lookup(frame, properties, by=by, rest=rest, outside=outside)
    fixed = [key for key in axes if key not in varied]
    return result.drop(columns=fixed).set_index([*varied, header])
