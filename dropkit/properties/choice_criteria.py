"""What liquids are chosen by: ranges and limits of properties and constants, read from a call."""

from __future__ import annotations

import math
from collections.abc import Iterator, Mapping
from dataclasses import dataclass
from typing import Any, Final, NoReturn

import numpy as np

from dropkit import units
from dropkit.errors import BadInput, nearest
from dropkit.properties import display
from dropkit.properties.property_words import PROPERTIES
from dropkit.record_index import CHOSEN_BY
from dropkit.unit_table import Kind, kind_of

__all__ = ["OPTIONS", "QUANTITIES", "Criterion", "kind_word", "read_criteria", "shown"]

# Everything that can be chosen by: properties, which need a temperature, and constants.
QUANTITIES: Final = (*PROPERTIES, *CHOSEN_BY)
OPTIONS: Final = ("at", "family", "grade", "plausible")
# A temperature is as far off by this as another quantity by a factor of e.
KELVIN_PER_FACTOR: Final = 100.0


def kind_word(quantity: str) -> str:
    """The kind of a property or constant: all constants but the molar mass are temperatures."""
    return "temperature" if quantity in CHOSEN_BY[1:] else quantity


def _kind(quantity: str) -> Kind:
    return kind_of(kind_word(quantity))[0]


def in_unit(quantity: str, value: float, *, with_units: bool) -> float:
    """An SI value in the trade's unit, temperatures too, or as it is."""
    kind = _kind(quantity)
    return (value - kind.zero) / kind.per_stock if with_units else value


def shown(quantity: str, value: float) -> str:
    """An SI value with the trade's unit, for reading."""
    number = display.number(in_unit(quantity, value, with_units=True))
    unit = display.unit_of(kind_word(quantity))
    return number if unit == "-" else f"{number} {unit}"


@dataclass(frozen=True, slots=True)
class Criterion:
    """One range or limit that a liquid must keep.

    Parameters
    ----------
    quantity : str
        A property or constant.
    low, high : float
        Ends [SI]; infinite where there is none.
    strict : bool
        Whether the ends themselves are outside.
    with_units : bool
        Whether it was given with a unit: values then come in the trade's.
    """

    quantity: str
    low: float
    high: float
    strict: bool
    with_units: bool

    def holds(self, value: float) -> bool:
        """Whether a value [SI] lies inside."""
        if self.strict:
            return self.low < value < self.high
        return self.low <= value <= self.high

    def miss(self, value: float) -> float:
        """How far a value [SI] lies outside: as the logarithm of a ratio; 100 K count as e."""
        end = self.low if value <= self.low else self.high
        if self.holds(value) or value == end:
            return 0.0
        if kind_word(self.quantity) == "temperature":
            return abs(value - end) / KELVIN_PER_FACTOR
        return abs(math.log(value / end)) if end > 0.0 else math.inf

    @property
    def limits(self) -> str:
        """What is wanted, with the trade's unit."""
        low, high = (shown(self.quantity, end) for end in (self.low, self.high))
        if self.strict:
            return f"above {low}" if self.low > -math.inf else f"below {high}"
        if self.low == -math.inf:
            return f"up to {high}"
        if self.high == math.inf:
            return f"from {low}"
        return f"from {low.partition(' ')[0]} to {high}"

    def __str__(self) -> str:
        return f"{self.quantity} {self.limits}"


def read_criteria(given: Mapping[str, Any], *, plausible: bool) -> list[Criterion]:
    """Read the keyword arguments of a choice.

    Parameters
    ----------
    given : mapping
        Words such as ``viscosity`` or ``flash_point_above`` to ranges or limits.
    plausible : bool
        Refuse ends that no liquid has.

    Returns
    -------
    list of Criterion
        In the order given.

    Raises
    ------
    BadInput
        For an unknown word, and for what is no range or limit of that quantity.
    """
    return [_criterion(word, value, plausible) for word, value in given.items()]


def _criterion(word: str, value: Any, plausible: bool) -> Criterion:
    stem, _, side = word.rpartition("_")
    if side in ("above", "below") and stem in QUANTITIES:
        end, with_units = _end(value, stem, word, plausible)
        if end is None:
            raise BadInput(f"{word} is None", allowed="one number, such as a text with its unit")
        low, high = (end, math.inf) if side == "above" else (-math.inf, end)
        return Criterion(stem, low, high, True, with_units)
    if word not in QUANTITIES:
        raise BadInput(
            f"choose knows no criterion {word!r}",
            allowed=f"{', '.join(QUANTITIES)}, each also with _above or _below; "
            f"{', '.join(OPTIONS)}",
            choices=nearest(word, _words()),
        )
    return _range(word, value, plausible)


def _words() -> Iterator[str]:
    yield from OPTIONS
    for quantity in QUANTITIES:
        yield from (quantity, f"{quantity}_above", f"{quantity}_below")


def _range(word: str, value: Any, plausible: bool) -> Criterion:
    if _is_two_ends(value):
        first, second = value
        low, low_unit = _end(first, word, f"lowest {word}", plausible)
        high, high_unit = _end(second, word, f"highest {word}", plausible)
        # Nothing is nothing in any unit, except of temperature.
        nothing = 0.0 if kind_word(word) != "temperature" else None
        bare = [end for end, unit in ((low, low_unit), (high, high_unit)) if not unit]
        mixed = low_unit != high_unit and any(end not in (None, nothing) for end in bare)
        if mixed and not _kind(word).plain:
            raise BadInput(
                f"{word}={value!r}: one end carries a unit and the other does not",
                allowed="a unit for both, or two bare numbers in SI",
            )
        with_units = low_unit or high_unit
    else:
        # Two numbers with one unit, arrays and Quantities of two: as everywhere.
        both, asked = units.read(value, kind_word(word), word, domain=">= 0")
        ends = np.asarray(both, dtype=float)
        if ends.shape != (2,):
            _no_range(word, value)
        if plausible and (ends > 0.0).all():
            units.read(value, kind_word(word), word, plausible=True)
        low, high = (float(end) for end in ends)
        with_units = asked is not None
    if low is None and high is None:
        _no_range(word, value)
    low = -math.inf if low is None else low
    high = math.inf if high is None else high
    if not low <= high:
        _no_range(word, value)
    return Criterion(word, low, high, False, with_units)


def _is_two_ends(value: Any) -> bool:
    if not isinstance(value, (list, tuple)) or len(value) != 2:
        return False
    # (2, "mPa*s") is one value with its unit, as everywhere in dropkit.
    second = value[1].strip()[:1] if isinstance(value[1], str) else "1"
    return isinstance(value[0], str) or second.isdigit() or second in (".", "+", "-")


def _no_range(word: str, value: Any) -> NoReturn:
    raise BadInput(
        f"{word}={value!r} is no range",
        allowed="(lowest, highest), rising, one of them None for an open end",
        hint=f"For one limit use {word}_above or {word}_below",
    )


def _end(value: Any, quantity: str, name: str, plausible: bool) -> tuple[float | None, bool]:
    if value is None:
        return None, False
    si, asked = units.read(value, kind_word(quantity), name, domain=">= 0")
    if type(si) is not float or si != si:
        raise BadInput(f"{name} is {value!r}", allowed="one number, not NaN")
    if plausible and si > 0.0:
        units.read(value, kind_word(quantity), name, plausible=True)
    return si, asked is not None
