"""`NumbersSheet`: the numbers of a liquid with what each compares and what the trade says of them."""

from __future__ import annotations

from collections.abc import Iterator
from dataclasses import asdict, dataclass
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit import units
from dropkit.errors import BadInput, MissingProperty, UnknownName, nearest
from dropkit.numbers.limits import Limit
from dropkit.properties import display
from dropkit.properties.jsonable import from_plain, to_plain
from dropkit.provenance import Trail

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["NumberRow", "NumbersSheet"]

_HEADER: Final = ("number", "symbol", "value", "unit", "on the", "compares")
_TRADE: Final = "Limits that the trade quotes (rules of thumb, with how each was seen):"


@dataclass(frozen=True, eq=False)
class NumberRow:
    """One number of a sheet.

    Parameters
    ----------
    name, symbol : str
        The function in `dropkit.numbers` and its symbol.
    fluid : str
        ``"liquid"``, or ``"gas"`` for a number of the gas alone.
    value : float or ndarray
        The value, in SI.
    kind : str
        Kind of the value; ``"ratio"`` for a number.
    compares, scale : str
        What it compares, and the length that it is built on.
    limits : tuple of Limit
        What the trade quotes.

    Examples
    --------
    >>> NumberRow("fissility", "X", "liquid", 0.25, "ratio", "", "", ()).key
    'fissility'
    """

    name: str
    symbol: str
    fluid: str
    value: Any
    kind: str
    compares: str
    scale: str
    limits: tuple[Limit, ...]

    @property
    def key(self) -> str:
        """The name by which the sheet finds it; those of the gas end in ``" (gas)"``."""
        return self.name if self.fluid == "liquid" else f"{self.name} ({self.fluid})"

    @property
    def size(self) -> str:
        """The size that it is built on: ``"diameter"``, ``"radius"`` or nothing."""
        words = self.scale.lower().split()
        return next((size for size in ("diameter", "radius") if size in words), "")

    def said(self) -> tuple[str, ...]:
        """For each limit, on which side the value lies, where the limit stands and its source.

        Returns
        -------
        tuple of str
            One text for each of `limits`; arrays are counted.
        """
        return tuple(f"{_sides(limit, self.value)} [{limit}]" for limit in self.limits)


class NumbersSheet:
    """All numbers that a liquid at one condition and a size allow.

    Made by `numbers_sheet` or ``state.numbers(length, velocity)``. ``sheet["weber"]`` gives a
    value; ``sheet.missing`` says what was not formed and why.

    Parameters
    ----------
    subject : str
        The liquid.
    rows : tuple of NumberRow
        The numbers.
    missing : dict of str to str
        What could not be formed, and what it lacks.
    trails : tuple of Trail
        How the properties that entered were made.
    assumptions, cautions : tuple of str
        What was taken for granted, and what to know.
    versions : dict of str to str
        Versions of dropkit and its data.
    asked : Asked, optional
        How it was asked: None for SI, else Quantities in the registry of who asked.

    Examples
    --------
    >>> from types import SimpleNamespace
    >>> from dropkit import numbers
    >>> ink = SimpleNamespace(density=1000.0, viscosity=0.010, surface_tension=0.030)
    >>> sheet = numbers.numbers_sheet(ink, 25e-6, 6.0)
    >>> round(sheet["z_number"], 4)
    2.7386
    """

    def __init__(
        self,
        subject: str,
        rows: tuple[NumberRow, ...],
        missing: dict[str, str],
        trails: tuple[Trail, ...] = (),
        assumptions: tuple[str, ...] = (),
        cautions: tuple[str, ...] = (),
        versions: dict[str, str] | None = None,
        asked: units.Asked | None = None,
    ) -> None:
        self.subject = subject
        self.rows = rows
        self.missing = dict(missing)
        self.trails = trails
        self.assumptions = assumptions
        self.cautions = cautions
        self.versions = dict(versions or {})
        self._asked = asked

    # ------------------------------------------------ values
    def __eq__(self, other: object) -> bool:
        return isinstance(other, NumbersSheet) and other.to_dict() == self.to_dict()

    def __getitem__(self, key: str) -> Any:
        for row in self.rows:
            if row.key == key:
                return units.give(row.value, row.kind, self._asked)
        if key in self.missing:
            raise MissingProperty(f"{key} could not be formed: {self.missing[key]}")
        known = [row.key for row in self.rows]
        raise UnknownName(f"the sheet has no number {key!r}", choices=nearest(str(key), known))

    def __contains__(self, key: object) -> bool:
        return any(row.key == key for row in self.rows)

    def __iter__(self) -> Iterator[str]:
        return (row.key for row in self.rows)

    def __len__(self) -> int:
        return len(self.rows)

    def si(self) -> NumbersSheet:
        """The same sheet giving SI floats and arrays.

        Returns
        -------
        NumbersSheet
            With the same rows.

        Examples
        --------
        >>> import dropkit as dk
        >>> sheet = dk.liquid("water").at("20 degC").numbers("50 um")
        >>> round(sheet.si()["capillary_length"], 6)
        0.002726
        """
        return self._turned(None)

    def with_units(self) -> NumbersSheet:
        """The same sheet giving Quantities for lengths, times and speeds.

        Returns
        -------
        NumbersSheet
            With the same rows.

        Examples
        --------
        >>> import dropkit as dk
        >>> sheet = dk.liquid("water").at(293.15).numbers(50e-6).with_units()
        >>> print(f"{sheet['capillary_length']:.3f}")
        2.726 millimeter
        """
        return self._turned(self._asked or units.Asked())

    def _turned(self, asked: units.Asked | None) -> NumbersSheet:
        return NumbersSheet(
            self.subject,
            self.rows,
            self.missing,
            self.trails,
            self.assumptions,
            self.cautions,
            self.versions,
            asked,
        )

    @property
    def sources(self) -> tuple[str, ...]:
        """Keys of the sources of the properties that entered and of the limits shown."""
        keys = [key for trail in self.trails for key in trail.sources]
        keys += [limit.source for row in self.rows for limit in row.limits if limit.source]
        return tuple(dict.fromkeys(keys))

    # ------------------------------------------------ tables, dicts, display
    def table(self) -> pd.DataFrame:
        """The sheet as a DataFrame, one row for each number; arrays stand in the value column.

        Returns
        -------
        pandas.DataFrame
            Symbol, fluid, value, unit, what it compares, the length scale, and the limits.

        Examples
        --------
        >>> import dropkit as dk
        >>> sheet = dk.liquid("water").at("20 degC").numbers("50 um", "6 m/s")
        >>> print(f"{sheet.table().loc['weber', 'value']:.1f}")
        24.7
        """
        import pandas as pd

        columns = ["symbol", "fluid", "value", "unit", "compares", "scale", "limits"]
        frame = pd.DataFrame(index=pd.Index(list(self), name="number"), columns=columns)
        frame["symbol"] = [row.symbol for row in self.rows]
        frame["fluid"] = [row.fluid for row in self.rows]
        values = [self._shown(row) for row in self.rows]
        if all(isinstance(value, float) for value in values):
            frame["value"] = np.array(values)
        else:
            frame["value"] = pd.Series(values, index=frame.index, dtype=object)
        frame["unit"] = [self._unit(row) for row in self.rows]
        frame["compares"] = [row.compares for row in self.rows]
        frame["scale"] = [row.scale for row in self.rows]
        frame["limits"] = ["; ".join(row.said()) for row in self.rows]
        return frame

    def to_dict(self) -> dict[str, Any]:
        """A dict of plain types that survives JSON; `from_dict` rebuilds the sheet.

        Returns
        -------
        dict
            Rows [SI], trails, and what was not formed.

        Examples
        --------
        >>> import dropkit as dk
        >>> sheet = dk.liquid("water").at("20 degC").numbers("50 um", "6 m/s")
        >>> type(sheet).from_dict(sheet.to_dict())["weber"] == sheet["weber"]
        True
        """
        return {
            "kind": "NumbersSheet",
            "subject": self.subject,
            "rows": [{**asdict(row), "value": to_plain(row.value)} for row in self.rows],
            "missing": dict(self.missing),
            "trails": [trail.to_dict() for trail in self.trails],
            "assumptions": list(self.assumptions),
            "cautions": list(self.cautions),
            "versions": dict(self.versions),
            "with_units": self._asked is not None,
        }

    @classmethod
    def from_dict(cls, data: dict[str, Any]) -> NumbersSheet:
        """Rebuild a sheet from `to_dict`, also after a passage through JSON.

        Parameters
        ----------
        data : dict
            What `to_dict` gave.

        Returns
        -------
        NumbersSheet
            In SI or with units, as it was.

        Raises
        ------
        BadInput
            The dict of something else.
        """
        if not isinstance(data, dict) or data.get("kind") != "NumbersSheet":
            raise BadInput(
                "this is no dict of a NumbersSheet", allowed="what NumbersSheet.to_dict() gave"
            )
        return cls(
            data["subject"],
            tuple(
                NumberRow(
                    **{
                        **row,
                        "value": from_plain(row["value"]),
                        "limits": tuple(_limit(limit) for limit in row["limits"]),
                    }
                )
                for row in data["rows"]
            ),
            data["missing"],
            tuple(Trail.from_dict(trail) for trail in data["trails"]),
            tuple(data["assumptions"]),
            tuple(data["cautions"]),
            data["versions"],
            units.Asked() if data["with_units"] else None,
        )

    def _shown(self, row: NumberRow) -> Any:
        return row.value if self._asked is None else display.in_stock(row.kind, row.value)

    def _unit(self, row: NumberRow) -> str:
        return display.unit_of(row.kind, with_units=self._asked is not None)

    def _cells(self) -> list[tuple[str, ...]]:
        return [
            (
                row.key,
                row.symbol,
                display.number(self._shown(row)),
                self._unit(row),
                row.size or "-",
                row.compares,
            )
            for row in self.rows
        ]

    def _said(self) -> list[str]:
        """Each limit in a line: the number, the side, where it stands, source and note."""
        return [
            f"{row.key}: {said}" + (f" {limit.note}" if limit.note else "")
            for row in self.rows
            for said, limit in zip(row.said(), row.limits, strict=True)
        ]

    def _notes(self) -> list[str]:
        notes = [f"assumed: {text}" for text in self.assumptions]
        notes += [f"caution: {text}" for text in self.cautions]
        if self.missing:
            notes.append(f"not formed: {len(self.missing)}; .missing says what each lacks")
        return notes

    def __repr__(self) -> str:
        lines = [f"Numbers of {self.subject}", display.text_table(_HEADER, self._cells())]
        if said := self._said():
            lines += [_TRADE, *said]
        return "\n".join(lines + self._notes())

    def _repr_html_(self) -> str:
        table = display.html_table(_HEADER, self._cells(), f"Numbers of {self.subject}")
        said = "".join(f"<li>{display.escape(text)}</li>" for text in self._said())
        notes = "".join(f"<li>{display.escape(text)}</li>" for text in self._notes())
        return f"{table}<p>{_TRADE}</p><ul>{said}</ul><ul>{notes}</ul>"


def _sides(limit: Limit, value: Any) -> str:
    """On which side a value lies; for arrays how many elements on each."""
    if isinstance(value, float):
        return limit.side(value)
    flat = np.asarray(value, dtype=float).ravel()
    valid = flat[~np.isnan(flat)]
    counts = np.bincount(
        np.searchsorted(limit.bounds, valid, side="right"), minlength=len(limit.sides)
    )
    told: dict[str, int] = {}
    for side, count in zip(limit.sides, counts, strict=True):
        told[side] = told.get(side, 0) + int(count)
    told["unknown"] = flat.size - valid.size
    return ", ".join(f"{side} {count} of {flat.size}" for side, count in told.items() if count)


def _limit(data: dict[str, Any]) -> Limit:
    return Limit(**{**data, "bounds": tuple(data["bounds"]), "sides": tuple(data["sides"])})
