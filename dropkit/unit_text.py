"""The grammar of values with units: a number, an optional space, a unit.

Units are whole words of the table ("wt%", "bar(g)") or products and quotients of words
with powers ("kg/m3", "mN/m", "W/(m*K)", "mPa·s", "s-1"). Everything is exact fractions
until the last step and cached per text and kind. Errors here do not name the argument:
:mod:`dropkit.units` puts its name in front.
"""

from __future__ import annotations

import math
import re
import unicodedata
from collections.abc import Callable
from fractions import Fraction
from functools import lru_cache
from typing import Any, Final, NamedTuple, TypeAlias

import numpy as np

from dropkit.errors import BadInput, UnitError, Unphysical, nearest
from dropkit.unit_errors import mark_error, mismatch, needs
from dropkit.unit_table import LENGTH, NONE, STANDARD_ATMOSPHERE, Dimension, Kind
from dropkit.unit_trade import (
    NEEDLE_GAUGES,
    NEEDLE_WORDS,
    PREFIXED,
    PREFIXES,
    REFUSED,
    SINGLE,
    WHOLE,
    Unit,
)

__all__ = ["Lookup", "Scale", "convert", "long_names", "quantity"]

Lookup: TypeAlias = Callable[[str], tuple[float, Dimension] | None]
"""Asks pint for a single word: its SI factor and dimension, or None."""

_LONGEST: Final = 100  # characters of a string that is still read
_HIGHEST: Final = 12  # power of a unit

_NUMBER: Final = re.compile(r"[+-]?(?:[0-9]+\.?[0-9]*|\.[0-9]+)(?:[eE][+-]?[0-9]+)?")
_COMMA: Final = re.compile(r"([+-]?[0-9]*),([0-9]+)")
_LETTER: Final = r"A-Za-zµμΩÅ°_"
_TOKEN: Final = re.compile(
    rf"(?P<word>[{_LETTER}][{_LETTER}0-9]*?)(?:(?:\^|\*\*)?(?P<power>[+-]?[0-9]+))?(?![{_LETTER}0-9])"
    r"|(?P<one>1(?![0-9.]))|(?P<sign>\*(?!\*)|[/().·⋅×]|-(?=[A-Za-z]))"
)
_RUN_TOGETHER: Final = re.compile(r"([A-Za-z]+)([2-4])([A-Za-z]+)")  # "W/m2K"


class Scale(NamedTuple):
    """SI value = value * up / down + zero, with the exact fractions behind it."""

    up: float
    down: float
    zero: float
    exact: Fraction
    exact_zero: Fraction

    def __call__(self, value: Any) -> Any:
        """SI value of a float or array."""
        if self.up != 1.0:
            value = value * self.up
        if self.down != 1.0:
            value = value / self.down
        return value + self.zero if self.zero else value

    def back(self, si: Any) -> Any:
        """Value in this unit of an SI float or array."""
        value = si - self.zero if self.zero else si
        if self.down != 1.0:
            value = value * self.down
        return value / self.up if self.up != 1.0 else value


def _scale(factor: Fraction, zero: Fraction = Fraction(0)) -> Scale:
    up, down = factor.numerator, factor.denominator
    if up >= 2**53 or down >= 2**53:  # beyond the whole numbers that a float holds
        return Scale(float(factor), 1.0, float(zero), factor, zero)
    return Scale(float(up), float(down), float(zero), factor, zero)


# --- units -------------------------------------------------------------------------------


def _tidy(unit: str) -> str:
    """One spelling of what is written in many: raised digits, minus signs, spaces, micro."""
    unit = unicodedata.normalize("NFKC", unit)
    unit = unit.replace("\u2212", "-").replace("\u03bc", "u").replace("\u03a9", "ohm")
    return " ".join(unit.split())


def _known(word: str) -> tuple[Unit, str] | None:
    """A word of the table, with or without a prefix, and pint's long name of it."""
    found = SINGLE.get(word) or PREFIXED.get(word)
    if found is not None:
        return found
    prefix, found = PREFIXES.get(word[:1]), PREFIXED.get(word[1:])
    if prefix is None or found is None:
        return None
    unit, name = found
    return unit._replace(factor=unit.factor * Fraction(10) ** prefix[0]), prefix[1] + name


class _Unknown(Exception):
    """A word that the table lacks while pint may not be asked."""


def _word(word: str, lookup: Lookup | None) -> tuple[Fraction, Dimension]:
    found = _known(word)
    if found is not None:
        return found[0].factor, found[0].dimension
    if word in REFUSED:
        raise UnitError(f"{word!r} has several meanings", hint=f"Write {REFUSED[word]}")
    if lookup is None:
        raise _Unknown(word)
    asked = lookup(word)
    if asked is None:
        usual = [*WHOLE, *SINGLE, *PREFIXED, "um", "mm", "mPas", "cP", "cSt", "kPa", "mN", "kHz"]
        raise UnitError(f"unit {word!r} is not known", choices=nearest(word, usual))
    return Fraction(asked[0]), asked[1]


def _tokens(text: str) -> list[tuple[str, str, int]]:
    """(form, text, power) of each word, bracket and sign; a space between words is a sign."""
    tokens: list[tuple[str, str, int]] = []
    at = 0
    while at < len(text):
        match = _TOKEN.match(text, at)
        if match is None:
            raise UnitError(f"the unit {text!r} cannot be read from {text[at:]!r} on")
        at = match.end()
        if match["word"]:
            word, power = match["word"], match["power"] or "1"
            split = None if _known(word) else _RUN_TOGETHER.fullmatch(word)
            if split is not None:
                tokens += [("word", split[1], int(split[2])), ("sign", " ", 0)]
                word = split[3]
            if len(power) > 3 or abs(int(power)) > _HIGHEST:
                raise UnitError(f"the unit {text!r} has the power {power}")
            tokens.append(("word", word, int(power)))
        else:
            tokens.append(("one", "1", 1) if match["one"] else ("sign", match["sign"], 0))
        if text[at : at + 1] == " ":
            at += 1
            if text[at : at + 1] not in "/*·⋅×.)" and tokens[-1][1] not in ("/*·⋅×.("):
                tokens.append(("sign", " ", 0))
    return tokens


def _product(
    tokens: list[tuple[str, str, int]], at: int, below: bool
) -> tuple[list[tuple[str, int]], int]:
    """Words and powers of a product or quotient from `at` on, and where it ends.

    Reading runs from left to right; with `below`, a factor joined by a space or a dot stays
    under the slash before it, as most people mean "W/m K".
    """
    words: list[tuple[str, int]] = []
    sign = 1
    if at < len(tokens) and tokens[at][1] == "/":  # "/min"
        sign, at = -1, at + 1
    while True:
        if at >= len(tokens):
            raise UnitError("the unit is not complete")
        form, text, power = tokens[at]
        if form == "word":
            words.append((text, sign * power))
        elif text == "(":
            inner, at = _product(tokens, at + 1, below)
            if at >= len(tokens) or tokens[at][1] != ")":
                raise UnitError("the unit has an open bracket")
            words += [(word, sign * power) for word, power in inner]
        elif form == "sign":
            raise UnitError(f"the unit has a {text!r} in the wrong place")
        at += 1
        if at >= len(tokens) or tokens[at][1] == ")":
            return words, at
        text = tokens[at][1]
        if tokens[at][0] == "sign" and text != "(":
            if text == "/":
                sign = -1
            elif text in "*×" or not below:
                sign = 1
            at += 1
        elif not below:  # "m(..." without a sign
            sign = 1


def _words(text: str, below: bool) -> list[tuple[str, int]]:
    words, end = _product(tokens := _tokens(text), 0, below)
    if end != len(tokens):
        raise UnitError(f"the unit {text!r} has a bracket too many")
    return words


def _compound(text: str, kind: Kind, lookup: Lookup | None) -> Scale:
    """Scale of a compound unit; the reading that has the declared dimension counts."""
    error: UnitError | None = None
    for below in (False, True):
        factor, dimension = Fraction(1), list(NONE)
        for word, power in _words(text, below):
            if kind.name == "temperature" and word in ("degC", "degF", "°C", "°F"):
                raise UnitError(f"{text!r} is no temperature scale", allowed=needs(kind))
            one, its = _word(word, lookup)
            factor *= one**power
            dimension = [a + b * power for a, b in zip(dimension, its, strict=True)]
        if tuple(dimension) == kind.dimension:
            return _scale(factor)
        m, kg, s, a, k, mol = dimension
        error = error or mismatch(text, (m, kg, s, a, k, mol), kind)
    assert error is not None
    raise error


@lru_cache(maxsize=2048)
def _resolve(text: str, kind: Kind) -> Scale | None:
    """Scale of a unit; None if only pint could tell, whose answer is never kept."""
    if text in REFUSED:
        raise UnitError(f"{text!r} has several meanings", hint=f"Write {REFUSED[text]}")
    whole = WHOLE.get(text)
    if whole is None:
        try:
            return _compound(text, kind, None)
        except _Unknown:
            return None
    if whole.dimension != kind.dimension:
        raise mismatch(text, whole.dimension, kind)
    if whole.mark and whole.mark not in kind.accepts:
        raise mark_error(text, whole.mark, kind)
    if whole.mark == "gauge" and "absolute" in kind.accepts:
        return _scale(whole.factor, Fraction(STANDARD_ATMOSPHERE))
    return _scale(whole.factor, whole.zero)


def _special(unit: str, kind: Kind) -> Callable[[Any], Any] | None:
    """The two units that are no factor: a needle gauge, and dots per inch as a pitch."""
    if unit in NEEDLE_WORDS:
        if kind.dimension == LENGTH and "needle" not in kind.accepts:
            raise mark_error(unit, "needle", kind)
        if kind.dimension != LENGTH:
            raise UnitError(f"{unit!r} is a needle gauge, which names an inner diameter",
                            allowed=needs(kind))  # fmt: skip
        return _needle
    if unit == "dpi" and kind.name == "pitch":
        return _dots
    return None


def _needle(value: Any) -> Any:
    found = [NEEDLE_GAUGES.get(number, math.nan) for number in np.ravel(value).tolist()]
    metres = np.array(found, dtype=np.float64).reshape(np.shape(value)) / 1e6
    if np.isnan(metres).any():
        raise UnitError(
            "no inner diameter is on record for that needle gauge",
            allowed=f"whole numbers from {min(NEEDLE_GAUGES)} to {max(NEEDLE_GAUGES)}",
            hint="Write the measured inner diameter, such as '110 um'",
        )
    return metres if isinstance(value, np.ndarray) else float(metres)


def _dots(value: Any) -> Any:
    if np.any(np.equal(value, 0.0)):
        raise Unphysical("0 dpi is no pitch")
    return 0.0254 / value


def convert(value: Any, unit: str, kind: Kind, lookup: Lookup) -> Any:
    """SI value of a float or array beside a unit given as text.

    Parameters
    ----------
    value : float or numpy.ndarray
        The number in that unit.
    unit : str
        The unit.
    kind : Kind
        What it must measure.
    lookup : callable
        Asks pint for a word that the table lacks.

    Returns
    -------
    float or numpy.ndarray
        The SI value.

    Raises
    ------
    UnitError
        For a unit that is unknown, ambiguous or of another dimension.
    """
    text = _checked(unit)
    special = _special(text, kind)
    if special is not None:
        return special(value)
    if not text:
        return _without_unit(value, kind)
    return (_resolve(text, kind) or _compound(text, kind, lookup))(value)


def _checked(unit: str) -> str:
    if len(unit) > _LONGEST:
        raise UnitError(f"a unit of {len(unit)} characters is too long")
    return _tidy(unit)


def _without_unit(value: Any, kind: Kind) -> Any:
    if kind.si:
        raise UnitError(
            "it has no unit",
            allowed=needs(kind),
            hint=f"A bare number without quotes is taken in {kind.si}",
        )
    return value


# --- whole strings -----------------------------------------------------------------------


def _split(text: str) -> tuple[str, str]:
    """Digits and unit of a string such as "60 um"."""
    if len(text) > _LONGEST:
        raise BadInput(f"text of {len(text)} characters is too long for a number with a unit")
    plain = text.strip().replace("\u2212", "-")
    comma = _COMMA.match(plain)
    if comma is not None:
        rest = plain[comma.start(2) :]
        whole = f"; if the comma marks thousands, '{comma[1]}{rest}'" if len(comma[2]) == 3 else ""
        raise BadInput("a decimal comma is not read", hint=f"Write '{comma[1]}.{rest}'{whole}")
    match = _NUMBER.match(plain)
    if match is None:
        raise BadInput("it does not start with a number",
                       hint="Write a number and a unit, such as '60 um'")  # fmt: skip
    unit = plain[match.end() :].strip()
    if re.match("_?[0-9]", unit) and not re.match("1 ?/", unit):
        raise BadInput("it holds two numbers", hint="Write thousands without a space: '1000 um'")
    return match[0], unit


def _exact(digits: str, scale: Scale) -> float:
    """SI value of decimal digits, rounded once: "4.2 mPa*s" is 0.0042 to the last bit."""
    number = float(digits)
    if math.isinf(number):
        raise Unphysical(f"the number {digits} is too large")
    if number == 0.0:  # also digits too small for a float, whose fraction could be vast
        return float(scale.exact_zero)
    try:
        return float(Fraction(digits) * scale.exact + scale.exact_zero)
    except OverflowError:
        raise Unphysical(f"the number {digits} is too large") from None


@lru_cache(maxsize=4096)
def _from_table(text: str, kind: Kind) -> tuple[float, bool] | None:
    """SI value of a string, and whether it had a unit; None if pint must be asked."""
    digits, unit = _split(text)
    unit = _checked(unit)
    special = _special(unit, kind)
    if special is not None:
        return float(special(float(digits))), True
    if not unit:
        return float(_without_unit(_exact(digits, _ONE), kind)), False
    scale = _resolve(unit, kind)
    return None if scale is None else (_exact(digits, scale), True)


_ONE: Final = _scale(Fraction(1))


def quantity(text: str, kind: Kind, lookup: Lookup) -> tuple[float, bool]:
    """SI value of a string such as "60 um", and whether it had a unit.

    Parameters
    ----------
    text : str
        A number and a unit.
    kind : Kind
        What it must measure.
    lookup : callable
        Asks pint for a word that the table lacks.

    Returns
    -------
    tuple of float and bool
        The SI value; False for a plain number without a unit.

    Raises
    ------
    BadInput
        For text that is no number with a unit; UnitError for the unit.
    """
    found = _from_table(text, kind)
    if found is None:
        digits, unit = _split(text)
        found = _exact(digits, _compound(_checked(unit), kind, lookup)), True
    return found


def long_names(kind: Kind) -> tuple[Scale, dict[str, int]]:
    """Scale of a kind's stock unit and its words as pint spells them out.

    Parameters
    ----------
    kind : Kind
        The kind.

    Returns
    -------
    tuple of Scale and dict
        The scale, and long name -> power.
    """
    if kind.name == "temperature":
        return _scale(Fraction(1), Fraction(kind.zero)), {"degree_Celsius": 1}
    names: dict[str, int] = {}
    for word, power in _words(kind.stock, False):
        found = _known(word)
        assert found is not None, word
        names[found[1]] = names.get(found[1], 0) + power
    return _compound(kind.stock, kind, None), names
