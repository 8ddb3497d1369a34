"""A frame of compositions and temperatures, read column by column, with a reason for each bad row."""

from __future__ import annotations

import re
from collections.abc import Iterable, Mapping
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit import records, units
from dropkit.errors import BadInput, CompositionError, DropkitError, UnknownName, nearest
from dropkit.properties.composition import (
    BASES,
    Composition,
    check_basis,
    read_composition,
    to_mass,
)
from dropkit.properties.curves import FloatArray
from dropkit.properties.mixtures import Mixture
from dropkit.properties.other_chemicals import key_of

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["Table", "tell"]

_HEADER: Final = re.compile(r"^\s*(?P<name>.+?)\s*[\[(]\s*(?P<unit>[^\[\]()]+?)\s*[\])]\s*$")
_TEMPERATURE: Final = ("temperature", "t")
# Likeness of a header to a name, from 0 to 1, from which it counts as misspelt.
_MISSPELT: Final = 0.8
# Units of a header that fix the basis of a fraction.
_PERCENT: Final = {
    "%": None, "wt%": "mass", "wt %": "mass", "mass%": "mass", "mass %": "mass", "%w/w": "mass",
    "mol%": "mole", "mol %": "mole", "vol%": "volume", "vol %": "volume", "%v/v": "volume",
}  # fmt: skip


def tell(reasons: Any, rows: Any, text: str) -> None:
    """Add a reason to some rows of an object array."""
    if len(rows):
        before = reasons[rows]
        reasons[rows] = np.where(before == "", text, before + "; " + text)


class Table:
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
        tell(self.reasons, np.flatnonzero(missing), "temperature is missing")

    def _read_temperature(self, column: pd.Series[Any], unit: str | None) -> None:
        numbers = _numbers(column, str(column.name))
        if unit is None:
            kelvin = numbers
        else:
            self.with_units = True
            kelvin = np.asarray(
                units.to_si((numbers, unit), "temperature", str(column.name), domain="any")
            )
        tell(self.reasons, np.flatnonzero(kelvin <= 0.0), "temperature at or below 0 K")
        self.temperature = np.where(kelvin > 0.0, kelvin, np.nan)

    def _read_components(
        self, columns: Mapping[str, tuple[FloatArray, str | None]], by: str | None, rest: str | None
    ) -> None:
        if rest is not None:
            rest = key_of(rest)
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
            tell(self.reasons, np.flatnonzero(np.isnan(given)), f"{key} is missing")
            negative = np.flatnonzero(given < -1e-9)
            for value in np.unique(given[negative]):
                rows = negative[given[negative] == value]
                text = f"{key} is {value:.4g}"
                if value < -0.5:
                    text += " (percent? divide by 100, or write [wt%] in the header)"
                tell(self.reasons, rows, text)
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
                tell(self.reasons, rows[sums == value], text)
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
                tell(self.reasons, rows, "no liquid in it")
                continue
            mass = tuple(self.mass[i][rows] for i in chosen)
            try:
                fluid = Mixture(Composition(keys, mass), estimates="allow", quiet=True)
            except CompositionError as problem:
                tell(self.reasons, rows, str(problem))
                continue
            yield rows, fluid

    def _pure_groups(self) -> Iterable[tuple[Any, Mixture]]:
        assert self._names is not None
        import pandas as pd

        blank = np.array([pd.isna(name) for name in self._names], dtype=bool)
        tell(self.reasons, np.flatnonzero(blank), "liquid is missing")
        names = pd.Series([str(name) for name in self._names])[~blank]
        for name, numbers in names.groupby(names).indices.items():
            everywhere = np.asarray(numbers)
            rows = everywhere[~np.isnan(self.temperature[everywhere])]
            try:
                single = read_composition({str(name): "rest"}, by="mass")
                fluid = Mixture(single, estimates="allow", quiet=True)
            except DropkitError as problem:
                tell(self.reasons, everywhere, str(problem))
                continue
            yield rows, fluid


def _split(header: Any) -> tuple[str, str | None]:
    text = str(header)
    match = _HEADER.match(text)
    return (match["name"], match["unit"]) if match else (text.strip(), None)


def _component(name: str, unit: str | None) -> str | None:
    """Record key of a header; None for a column that is no component."""
    try:
        return key_of(name)
    except (UnknownName, BadInput):  # the latter: a number that only looks like a CAS number
        close = nearest(name, records.index())
        fraction_like = unit is not None and unit.casefold() in _PERCENT
        # Among thousands of names any word has one that looks a little like it.
        if fraction_like or any(_alike(name, other) >= _MISSPELT for other in close):
            raise UnknownName(
                f"The column {name!r} is no component that is known",
                choices=close,
                hint="Rename the column if it is meant as something else",
            ) from None
        return None


def _alike(first: str, second: str) -> float:
    from difflib import SequenceMatcher

    return SequenceMatcher(None, first.casefold(), second.casefold()).ratio()


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
