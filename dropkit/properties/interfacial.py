"""Two liquids in contact: their interfacial tension, from measured records only."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from typing import TYPE_CHECKING, Any, Final, overload

import numpy as np

from dropkit import records, units
from dropkit.errors import BadInput, MissingProperty
from dropkit.properties.curves import Curve, FloatArray
from dropkit.properties.evaluation import Evaluation
from dropkit.properties.interface import Fluid
from dropkit.properties.pure import Liquid, liquid
from dropkit.properties.trails import record_use, relative_uncertainty, versions
from dropkit.provenance import Grade, Trail, worst_grade
from dropkit.record_types import INTERFACIAL
from dropkit.validity import Outside, Range

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["LiquidPair", "interfacial_tension", "liquid_pair", "liquid_pairs"]

SATURATED: Final = "clean liquids, each saturated with the other"
TRACES: Final = (
    "surface-active traces lower the tension, often further with time: measure your own liquids "
    "where it matters"
)


@overload
def interfacial_tension(a: Any, b: Any, temperature: float, *, outside: Outside = ...) -> float: ...
@overload
def interfacial_tension(a: Any, b: Any, temperature: Any, *, outside: Outside = ...) -> Any: ...
def interfacial_tension(a: Any, b: Any, temperature: Any, *, outside: Outside = "raise") -> Any:
    """Tension of the interface between two liquids [N/m], from a record of that pair.

    Holds for clean liquids that are saturated with one another, in the record's range.
    `liquid_pair` gives the grade, uncertainty and sources behind it.

    Parameters
    ----------
    a, b : str or Liquid
        Two pure liquids, in any order.
    temperature : float, array or with a unit
        Temperature [K].
    outside : {"raise", "warn", "nan", "allow"}
        What happens outside the stated range.

    Returns
    -------
    float, array or Quantity
        Interfacial tension [N/m; mN/m where asked with a unit], in the shape of `temperature`.

    Raises
    ------
    MissingProperty
        No record of that pair: nothing is estimated. Also for mixtures.
    UnknownName, AmbiguousName
        No liquid, or several, are called so.
    OutOfRange, BadInput
        Outside its range; not a temperature; one liquid twice.

    Notes
    -----
    Surface-active traces lower it, often further with time. Records hold for liquids that have
    saturated each other: between fresh ones it differs. Most are values at one temperature,
    held over a few kelvin; no slope is made up. Liquids that mix have no interface.

    Examples
    --------
    >>> import dropkit as dk
    >>> dk.interfacial_tension("water", "mercury", 293.15)
    0.415
    >>> print(dk.interfacial_tension("mercury", "water", "20 degC"))
    415.0 millinewton / meter
    """
    return liquid_pair(a, b).interfacial_tension(temperature, outside=outside)


def liquid_pair(a: Any, b: Any) -> LiquidPair:
    """Two pure liquids in contact, with all that is known of their interface.

    Holds for pairs that have a record; `liquid_pairs` lists them.

    Parameters
    ----------
    a, b : str or Liquid
        Two pure liquids, in any order.

    Returns
    -------
    LiquidPair
        With interfacial tension, range, grade, uncertainty, trail and sources.

    Raises
    ------
    MissingProperty
        No record of that pair; says the nearest ones. Also for mixtures.
    UnknownName, AmbiguousName, NotALiquid
        No liquid, or several, are called so; a solute.
    BadInput
        One liquid twice, or neither a name nor a liquid.

    Examples
    --------
    >>> import dropkit as dk
    >>> pair = dk.liquid_pair("mercury", "water")
    >>> pair.grade(), pair.uncertainty()
    ('single', 0.02)
    """
    one, two = sorted((_pure(a), _pure(b)), key=lambda entry: entry.key)
    if one.key == two.key:
        raise BadInput(f"{one.name} has no interface with itself", allowed="two different liquids")
    record = records.interface_record(one.key, two.key)
    if record is None:
        raise _missing(one, two)
    return LiquidPair(record)


def liquid_pairs() -> pd.DataFrame:
    """All pairs of liquids whose interfacial tension dropkit has a record of.

    Holds for the data of this version.

    Returns
    -------
    pandas.DataFrame
        One row per pair: keys ``liquid_1`` and ``liquid_2``; ``low`` and ``high``, the ends of
        the range [K]; ``interfacial_tension`` [N/m] in its middle; ``uncertainty`` there,
        relative and standard (k = 1); ``grade``.

    Raises
    ------
    RecordError
        If a record was changed since it was sealed.

    Examples
    --------
    >>> import dropkit as dk
    >>> table = dk.liquid_pairs().set_index(["liquid_1", "liquid_2"])
    >>> float(table.loc[("mercury", "water"), "interfacial_tension"])
    0.415
    """
    import pandas as pd

    rows = []
    for first, second in records.interfaces():
        record = records.interface_record(first, second)
        assert record is not None
        interface = _Interface(record)
        limits = interface._record_range(INTERFACIAL)
        middle = 0.5 * (limits.low + limits.high)
        trail = interface._record_trail(INTERFACIAL, middle)
        rows.append(
            {
                "liquid_1": first,
                "liquid_2": second,
                "low": limits.low,
                "high": limits.high,
                INTERFACIAL: interface._record_scalar(INTERFACIAL)(middle),
                "uncertainty": trail.uncertainty,
                "grade": trail.grade,
            }
        )
    columns = ["liquid_1", "liquid_2", "low", "high", INTERFACIAL, "uncertainty", "grade"]
    return pd.DataFrame(rows, columns=columns)


class LiquidPair:
    """Two pure liquids in contact, read from the record of their interface.

    Made by `liquid_pair`; see there for an example.

    Parameters
    ----------
    record : PairRecord
        The record, as `dropkit.records.interface_record` gives it.
    """

    def __init__(self, record: records.PairRecord) -> None:
        self.record = record
        self._interface = _Interface(record)
        self.name = self._interface.name

    def __reduce__(self) -> tuple[Any, ...]:
        return (liquid_pair, self.record.components)

    def __eq__(self, other: object) -> bool:
        return isinstance(other, LiquidPair) and other.record == self.record

    def __hash__(self) -> int:
        return hash(("LiquidPair", self.record.components))

    def __repr__(self) -> str:
        return str(self.trail())

    @overload
    def interfacial_tension(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def interfacial_tension(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def interfacial_tension(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Tension of the interface [N/m].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K].
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Interfacial tension [N/m; mN/m where asked with a unit].

        Raises
        ------
        OutOfRange, BadInput
            Outside its range; not a temperature.
        """
        return self._interface._look(INTERFACIAL, temperature, outside)

    def range(self) -> Range:
        """The stated temperature range [K].

        Returns
        -------
        Range
            With the ends `low` and `high`.

        Examples
        --------
        >>> import dropkit as dk
        >>> print(dk.liquid_pair("mercury", "water").range())
        288.15 to 298.15 K (15 to 25 degC)
        """
        return self._interface._record_range(INTERFACIAL)

    def grade(self) -> Grade:
        """How far the record can be trusted.

        Returns
        -------
        str
            One of `dropkit.provenance.GRADES`, the worst of several records.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.liquid_pair("mercury", "water").grade()
        'single'
        """
        return self.trail().grade

    def uncertainty(self, temperature: Any = None) -> float | None:
        """Relative standard uncertainty (k = 1) of the interfacial tension.

        Parameters
        ----------
        temperature : float, array or with a unit, optional
            Where it is asked [K]; by default over all records.

        Returns
        -------
        float or None
            The largest over the temperatures [-]; None where none is known, as out of range.

        Raises
        ------
        BadInput
            Not a temperature.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.liquid_pair("mercury", "water").uncertainty("20 degC")
        0.02
        """
        return self.trail(temperature).uncertainty

    def trail(self, temperature: Any = None) -> Trail:
        """How the interfacial tension is made: records, grade, range, sources, cautions.

        Parameters
        ----------
        temperature : float, array or with a unit, optional
            Where it is asked [K]; where given, only the records that serve it are named.

        Returns
        -------
        Trail
            Printed, one line for each record.

        Raises
        ------
        BadInput
            Not a temperature.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.liquid_pair("mercury", "water").trail().sources
        ('AdamsonGast1997',)
        """
        kelvin = None if temperature is None else units.to_si(temperature, "temperature")
        return self._interface._trail(INTERFACIAL, kelvin)

    @property
    def sources(self) -> tuple[str, ...]:
        """Keys of the sources that the record rests on; `dropkit.cite` lists them."""
        return self.trail().sources

    @property
    def cautions(self) -> tuple[str, ...]:
        """What to know before use."""
        return self.trail().cautions


class _Interface(Evaluation):
    """Units, ranges and warnings as for a liquid, for the one property of an interface."""

    def __init__(self, record: records.PairRecord) -> None:
        super().__init__()
        entries = records.summaries()
        names = [entries[key]["name"] if key in entries else key for key in record.components]
        self.name = " / ".join(names)
        self._curve = Curve(record.properties[INTERFACIAL])

    def available(self) -> tuple[str, ...]:
        return (INTERFACIAL,)

    @property
    def cautions(self) -> tuple[str, ...]:
        return self._record_trail(INTERFACIAL, None).cautions

    def _broadcast(self, shape: tuple[int, ...]) -> _Interface:
        return self

    def _record_blocks(self, prop: str) -> Sequence[records.PropertyRecord]:
        return self._curve.records

    def _record_range(self, prop: str) -> Range:
        return self._curve.range

    def _record_scalar(self, prop: str) -> Callable[[float], float]:
        return self._curve.scalar

    def _record_fill(
        self, prop: str, part: slice, temperature: FloatArray, out: FloatArray
    ) -> None:
        self._curve.fill(temperature, out)

    def _record_trail(self, prop: str, temperature: float | FloatArray | None) -> Trail:
        blocks, value = list(self._curve.records), None
        if temperature is not None:
            kelvin = np.asarray(temperature, dtype=float).reshape(-1)
            kelvin = np.ascontiguousarray(kelvin[self._curve.range.holds(kelvin)])
            kelvin = kelvin[~np.isnan(kelvin)]
            if kelvin.size:
                blocks = [blocks[n] for n in np.unique(self._curve.serve(kelvin))]
                out = np.empty(kelvin.size)
                self._curve.fill(kelvin, out)
                value = float(out.min())
        known = temperature is None or value is not None
        return Trail(
            quantity=prop,
            subject=self.name,
            method="; ".join(dict.fromkeys(f"{b.form} ({b.obtained})" for b in blocks)),
            grade=worst_grade(block.grade for block in blocks),
            uncertainty=max(relative_uncertainty(b, value) for b in blocks) if known else None,
            records=tuple(record_use(block) for block in blocks),
            assumptions=(SATURATED,),
            cautions=(TRACES, *dict.fromkeys(text for b in blocks for text in b.cautions)),
            versions=versions(),
        )


def _pure(given: Any) -> Liquid:
    if isinstance(given, Liquid):
        return given
    if isinstance(given, Fluid):
        raise MissingProperty(
            f"The interfacial tension of {given.name} is not known: records hold pure liquids, "
            "and whatever is dissolved may gather at the interface",
            allowed="pairs of pure liquids, as dropkit.liquid_pairs() lists them",
            hint="Nothing is estimated: measure it",
        )
    return liquid(given)


def _missing(one: Liquid, two: Liquid) -> MissingProperty:
    what = f"There is no record of the interfacial tension of {one.name} against {two.name}"
    if _mix(one.key, two.key):
        what += "; they mix in all proportions"
    return MissingProperty(
        what,
        allowed="the pairs that dropkit.liquid_pairs() lists",
        choices=_nearest(one.key, two.key),
        hint="Nothing is estimated, because traces and mutual solubility decide it: measure it",
    )


def _mix(one: str, two: str) -> bool:
    """Whether the record of their mixture holds from the one to the other."""
    record = records.pair_record(one, two)
    blocks = record.properties.get("density", ()) if record is not None else ()
    return any(block.parameters["fraction_range"] == (0.0, 1.0) for block in blocks)


def _nearest(one: str, two: str) -> list[str]:
    """Up to three pairs that hold one of the two liquids; those with a like partner first."""
    entries = records.summaries()
    found = []
    for pair in records.interfaces():
        for kept, lost in ((one, two), (two, one)):
            if kept in pair and all(key in entries for key in pair):
                partner = pair[1] if pair[0] == kept else pair[0]
                family = entries[lost]["family"] if lost in entries else ""
                unlike = entries[partner]["family"] != family
                found.append((unlike, pair))
    return [" / ".join(entries[key]["name"] for key in pair) for _, pair in sorted(found)[:3]]
