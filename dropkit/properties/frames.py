"""Whole tables at once: `lookup` over a frame of compositions and temperatures, and `grid`."""

from __future__ import annotations

import re
from collections.abc import Iterable, Mapping, Sequence
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
from dropkit.properties.mixtures import Mixture
from dropkit.properties.property_names import GRADED, KELVIN_HINT, property_names
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
    wanted = property_names(properties)
    doubled = frame.columns[frame.columns.duplicated()]
    if len(doubled):
        raise BadInput(f"The frame has two columns {doubled[0]!r}", allowed="one of each name")
    table = _Table(frame, by, rest)
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
    table: _Table,
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
            _tell(reasons, rows, str(problem))
            continue
        fluid._warn_if_recalled(prop)
        values[prop][rows] = got
        lost = np.isnan(got)
        codes = np.maximum(codes, np.where(lost, -1, fluid.grade_codes(prop, kelvin)))
        beyond = ~lost & ~np.asarray(limits.holds(kelvin))
        _tell(reasons, rows[beyond], f"{prop}: extrapolated, outside {limits}")
        if lost.any():
            inside = np.asarray(limits.holds(kelvin))
            _tell(reasons, rows[lost & inside], f"{prop}: composition out of range")
            cold = lost & ~inside & (kelvin < 150.0) & (not with_units)
            _tell(reasons, rows[lost & ~inside & ~cold], f"{prop}: temperature outside {limits}")
            _tell(reasons, rows[cold], f"{prop}: temperature outside {limits}; {KELVIN_HINT}")
    # A grade belongs to what was given; a row without a value has none.
    grades[rows] = np.array([*GRADES, ""], dtype=object)[codes]


def _tell(reasons: Any, rows: Any, text: str) -> None:
    """Add a reason to some rows of an object array."""
    if len(rows):
        before = reasons[rows]
        reasons[rows] = np.where(before == "", text, before + "; " + text)


class _Table:
    """A frame read column by column: temperatures, mass fractions, and rows that can't be used."""

    def __init__(self, frame: pd.DataFrame, by: str | None, rest: str | None) -> None:
        if by is not None:
            check_basis(by)
        self.size = len(frame)
        self.reasons = np.full(self.size, "", dtype=object)
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
        missing = np.isnan(self.temperature) & (self.reasons == "")
        _tell(self.reasons, np.flatnonzero(missing), "temperature is missing")

    def _read_temperature(self, column: pd.Series[Any], unit: str | None) -> None:
        numbers = _numbers(column, str(column.name))
        if unit is None:
            kelvin = numbers
        else:
            self.with_units = True
            kelvin = np.asarray(
                units.to_si((numbers, unit), "temperature", str(column.name), domain="any")
            )
        _tell(self.reasons, np.flatnonzero(kelvin <= 0.0), "temperature at or below 0 K")
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
            given = shares[key]
            _tell(self.reasons, np.flatnonzero(np.isnan(given)), f"{key} is missing")
            negative = np.flatnonzero(given < -1e-9)
            for value in np.unique(given[negative]):
                rows = negative[given[negative] == value]
                text = f"{key} is {value:.4g}"
                if value < -0.5:
                    text += " (percent? divide by 100, or write [wt%] in the header)"
                _tell(self.reasons, rows, text)
            bad |= ~(shares[key] >= -1e-9)
        off = np.zeros(self.size, dtype=bool)
        if not amounts:
            off = ~bad & (np.abs(np.asarray(total) - 1.0) > 1e-6)
            rows = np.flatnonzero(off)
            sums = np.asarray(total)[rows]
            for value in np.unique(sums):
                text = f"fractions add up to {value:.6g}, not 1"
                if 50.0 < value < 150.0:
                    text += " (percent? divide by 100, or write [wt%] in the header)"
                elif rest is None and value < 1.0:
                    text += " (rest= names the component that fills up)"
                _tell(self.reasons, rows[sums == value], text)
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
                _tell(self.reasons, rows, "no liquid in it")
                continue
            mass = tuple(self.mass[i][rows] for i in chosen)
            try:
                fluid = Mixture(Composition(keys, mass), estimates="allow", quiet=True)
            except CompositionError as problem:
                _tell(self.reasons, rows, str(problem))
                continue
            yield rows, fluid

    def _pure_groups(self) -> Iterable[tuple[Any, Mixture]]:
        assert self._names is not None
        import pandas as pd

        names = pd.Series([str(name) for name in self._names])
        for name, numbers in names.groupby(names).indices.items():
            everywhere = np.asarray(numbers)
            rows = everywhere[~np.isnan(self.temperature[everywhere])]
            try:
                single = read_composition({str(name): "rest"}, by="mass")
                fluid = Mixture(single, estimates="allow", quiet=True)
            except DropkitError as problem:
                _tell(self.reasons, everywhere, str(problem))
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
    except (TypeError, ValueError, OverflowError) as problem:
        where = next((place for place, x in enumerate(column) if not _is_number(x)), 0)
        raise BadInput(
            f"The column {header!r} holds text: row {where} is {column.iloc[where]!r}",
            allowed="numbers with a decimal point, or NaN",
        ) from problem
    if np.isinf(numbers).any():
        raise BadInput(f"The column {header!r} holds infinity", allowed="finite numbers or NaN")
    return numbers


def _is_number(value: Any) -> bool:
    try:
        float(value)
    except (TypeError, ValueError, OverflowError):
        return False
    return True


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

    if by is None or not isinstance(components, Mapping):
        read_composition(components, by=by)  # raises in the same words
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
    mesh = np.meshgrid(*axes.values(), shown, indexing="ij")
    frame = pd.DataFrame(dict(zip((*axes, header), map(np.ravel, mesh), strict=True)))
    result = lookup(frame, properties, by=by, rest=rest, outside=outside)
    fixed = [key for key in axes if key not in varied]
    return result.drop(columns=fixed).set_index([*varied, header])
