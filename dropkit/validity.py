"""Ranges of validity, domains of arguments, and the one policy for values outside a range.

The words of the policy mean the same everywhere in dropkit:

``"raise"``  an error that counts and names the elements (the default);
``"warn"``   the value, with one warning;
``"nan"``    NaN in those elements, silently;
``"allow"``  the value, silently, though never below half of a record's lowest temperature.
"""

from __future__ import annotations

import math
from dataclasses import dataclass
from typing import Any, Final, Literal, TypeAlias

import numpy as np

from dropkit.errors import BadInput, OutOfRange, RangeWarning, Unphysical, warn_user

__all__ = ["OUTSIDE", "Domain", "Outside", "Range", "check_outside", "settle"]

Outside: TypeAlias = Literal["raise", "warn", "nan", "allow"]
OUTSIDE: Final[tuple[str, ...]] = ("raise", "warn", "nan", "allow")
Domain: TypeAlias = Literal["> 0", ">= 0", "0..1", "any"]

_DOMAIN_WORDS: Final = {
    "> 0": "positive and finite",
    ">= 0": "zero or positive, and finite",
    "0..1": "between 0 and 1",
    "any": "finite",
}


def check_outside(outside: str) -> None:
    """Raise BadInput unless `outside` is one of the four words of the policy."""
    if not isinstance(outside, str) or outside not in OUTSIDE:
        raise BadInput(f"outside={outside!r} is not known", allowed=", ".join(map(repr, OUTSIDE)))


@dataclass(frozen=True, slots=True)
class Range:
    """A closed interval of one argument, in SI.

    Parameters
    ----------
    low, high : float
        Ends of the interval, both included; infinite where there is no limit.
    what : str
        The argument that it limits, such as ``"temperature"``.
    unit : str
        SI unit of the ends; empty for pure numbers.
    """

    low: float
    high: float
    what: str = "temperature"
    unit: str = "K"

    def __post_init__(self) -> None:
        if not self.low <= self.high:
            raise BadInput(f"range of {self.what} runs from {self.low} to {self.high}")

    def holds(self, value: Any) -> Any:
        """Where some values lie inside; NaN counts as inside.

        Parameters
        ----------
        value : float or ndarray
            Values, in SI.

        Returns
        -------
        bool or ndarray of bool
            In the shape of the values.

        Examples
        --------
        >>> Range(273.15, 373.15).holds(300.0)
        True
        """
        outside = (value < self.low) | (value > self.high)
        return ~outside if isinstance(outside, np.ndarray) else not outside

    def covers(self, values: Any) -> bool:
        """Whether all of some values lie inside.

        Parameters
        ----------
        values : float or ndarray
            Values, in SI.

        Returns
        -------
        bool
            False where one is NaN, or where there is none.

        Examples
        --------
        >>> Range(273.15, 373.15).covers(np.array([300.0, 400.0]))
        False
        """
        if isinstance(values, np.ndarray):
            return bool(values.size and self.low <= values.min() and values.max() <= self.high)
        return bool(self.low <= values <= self.high)

    def __str__(self) -> str:
        if self.unit == "K":
            return (
                f"{self.low:g} to {self.high:g} K "
                f"({self.low - 273.15:g} to {self.high - 273.15:g} degC)"
            )
        return f"{self.low:g} to {self.high:g} {self.unit}".rstrip()


def check_domain(name: str, value: Any, domain: Domain) -> None:
    """Raise Unphysical where `value` (float or float array) leaves its domain; NaN passes."""
    if isinstance(value, np.ndarray):
        if domain == "> 0":
            bad = (value <= 0) | np.isinf(value)
        elif domain == ">= 0":
            bad = (value < 0) | np.isinf(value)
        elif domain == "0..1":
            bad = (value < 0) | (value > 1)
        else:
            bad = np.isinf(value)
        if not bad.any():
            return
        where = np.argwhere(bad)
        first = tuple(int(i) for i in where[0])
        place = f"[{', '.join(map(str, first))}]" if first else ""
        raise Unphysical(
            f"{name} has {len(where)} of {value.size} elements outside its domain, "
            f"the first {name}{place} = {value[first]:g}",
            allowed=f"{name} must be {_DOMAIN_WORDS[domain]}",
        )
    if domain == "> 0":
        good = not value <= 0
    elif domain == ">= 0":
        good = not value < 0
    elif domain == "0..1":
        good = not (value < 0 or value > 1)
    else:
        good = True
    if not good or math.isinf(value):
        raise Unphysical(
            f"{name} = {value:g} (SI) is impossible",
            allowed=f"{name} must be {_DOMAIN_WORDS[domain]}",
        )


def settle(subject: str, value: Any, limits: Range, outside: str, *, hint: str = "") -> Any:
    """Apply the range policy to `value` (float or float array, SI) before a computation.

    Returns a mask of the elements that must become NaN: False, True, or a boolean
    array. Raises OutOfRange or warns once, naming the count and the first elements.
    """
    if limits.covers(value):
        return False
    inside = limits.holds(value)
    if inside is True or (isinstance(inside, np.ndarray) and inside.all()):
        return False
    if outside == "allow":
        return False
    if outside == "nan":
        return ~inside if isinstance(inside, np.ndarray) else True
    if isinstance(inside, np.ndarray):
        where = np.argwhere(~inside)
        shown = ", ".join(
            f"[{', '.join(str(int(i)) for i in place)}] = {value[tuple(place)]:g}"
            for place in where[:3]
        )
        more = ", ..." if len(where) > 3 else ""
        what = (
            f"{subject}: {len(where)} of {value.size} values of {limits.what} are out of range: "
            f"{shown}{more} {limits.unit}".rstrip()
        )
    else:
        what = f"{subject}: {limits.what} {value:g} {limits.unit}".rstrip() + " is out of range"
    if outside == "warn":
        warn_user(f"{what}; stated range {limits}", RangeWarning)
        return False
    nearest = limits.low if np.nanmin(value) < limits.low else limits.high
    raise OutOfRange(
        what,
        allowed=str(limits),
        hint=hint
        or f"The nearest valid value is {nearest:g} {limits.unit}".rstrip()
        + "; outside='warn', 'nan' or 'allow' changes what happens",
    )
