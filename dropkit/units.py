"""The boundary rule: any form of input to SI floats and arrays, and results back in units.

The only file that knows pint, and only by its public names, looked up when they are needed.
Bare numbers and arrays are SI. A unit is carried by a string ``"60 um"``, a tuple
``(60, "um")``, a list of such strings, or a Quantity of any registry. Strings are read by
the small grammar below; pint resolves only single words that :mod:`dropkit.unit_table`
lacks, and only where the declared dimension fits.
"""

from __future__ import annotations

import math
import re
import sys
import threading
import unicodedata
import weakref
from collections.abc import Iterable, Sequence
from decimal import Decimal
from fractions import Fraction
from functools import cache, lru_cache
from numbers import Real
from typing import Any, Final, NamedTuple, NoReturn

import numpy as np

from dropkit.errors import BadInput, ImplausibleValue, UnitError, Unphysical, nearest
from dropkit.unit_table import (
    KINDS,
    NEEDLE_GAUGES,
    NEEDLE_WORDS,
    NOMENCLATURE,
    PREFIXED,
    PREFIXES,
    REFUSED,
    SINGLE,
    STANDARD_ATMOSPHERE,
    WHOLE,
    ZERO_CELSIUS,
    Dimension,
    Kind,
    Slip,
    Unit,
)
from dropkit.validity import Domain, check_domain

__all__ = ["Asked", "give", "kelvin_hint", "kind_of", "read", "to_si"]

_LONGEST: Final = 100  # characters of a string that is still read
_DEEPEST: Final = 16  # levels of nested lists
_COLD: Final = 150.0  # K; below it a bare temperature was probably meant in degC
_DOMAINS: Final[dict[str, Domain]] = {
    "> 0": "> 0", ">= 0": ">= 0", "0..1": "0..1", "any": "any",
}  # fmt: skip

_NUMBER: Final = re.compile(r"[+-]?(?:[0-9]+\.?[0-9]*|\.[0-9]+)(?:[eE][+-]?[0-9]+)?")
_COMMA: Final = re.compile(r"([+-]?[0-9]*),([0-9]+)")
_TOKEN: Final = re.compile(
    r"\s*(?:(?P<word>[A-Za-zµμΩÅ°][A-Za-z0-9µμΩÅ°_]*?)(?P<power>(?:\^|\*\*)?[+-]?[0-9]+)?(?![A-Za-z0-9µμΩÅ°_])"
    r"|(?P<one>1(?![0-9.]))|(?P<sign>\*(?!\*)|/|\(|\)|[·⋅.×]))"
)


class Asked:
    """How a result was asked for: with units, in a registry or in pint's application registry.

    Parameters
    ----------
    registry : pint.UnitRegistry, optional
        The registry of the Quantity that carried the unit. It is held weakly; a pickled
        or copied `Asked` means the application registry.
    """

    __slots__ = ("_registry",)

    def __init__(self, registry: Any = None) -> None:
        self._registry = None if registry is None else weakref.ref(registry)

    @property
    def registry(self) -> Any:
        """The registry, or None for pint's application registry."""
        return None if self._registry is None else self._registry()

    def __reduce__(self) -> tuple[type[Asked], tuple[()]]:
        return (Asked, ())

    def __repr__(self) -> str:
        return "Asked()" if self.registry is None else "Asked(<registry>)"


_ASKED: Final = Asked()


# --- kinds ---------------------------------------------------------------------------


@lru_cache(maxsize=512)
def _kind(name: str) -> Kind:
    kind = KINDS.get(name) or KINDS.get(NOMENCLATURE.get(name, ""))
    if kind is None:
        raise BadInput(
            f"no kind of quantity is called {name!r}",
            choices=nearest(name, [*KINDS, *NOMENCLATURE]),
        )
    return kind


def kind_of(text: str | Kind) -> tuple[Kind, Domain]:
    """The kind and domain behind ``"velocity"``, ``"velocity > 0"`` or an argument word.

    Parameters
    ----------
    text : str or Kind
        Name of a kind, an argument word, either with a domain behind it.

    Returns
    -------
    tuple of Kind and str
        The kind and the domain: its own unless the text says otherwise.

    Raises
    ------
    BadInput
        For an unknown name or domain.

    Examples
    --------
    >>> kind_of("velocity > 0")[1]
    '> 0'
    """
    if isinstance(text, Kind):
        return text, text.domain
    if not isinstance(text, str) or not text.strip():
        raise BadInput(f"{text!r} does not name a kind of quantity")
    name, *rest = text.split(maxsplit=1)
    kind = _kind(name)
    if not rest:
        return kind, kind.domain
    domain = _DOMAINS.get(rest[0].strip())
    if domain is None:
        raise BadInput(f"domain {rest[0]!r} is not known", allowed=", ".join(_DOMAINS))
    return kind, domain


# --- the grammar -----------------------------------------------------------------------


class _Scale(NamedTuple):
    """SI value = value * up / down + zero; whole numbers keep (60, "um") equal to 60e-6."""

    up: float
    down: float
    zero: float
    exact: Fraction
    exact_zero: Fraction

    def __call__(self, value: Any) -> Any:
        if self.up != 1.0:
            value = value * self.up
        if self.down != 1.0:
            value = value / self.down
        return value + self.zero if self.zero else value


def _scale(factor: Fraction, zero: Fraction = Fraction(0)) -> _Scale:
    up, down = factor.numerator, factor.denominator
    if up >= 2**53 or down >= 2**53:
        return _Scale(float(factor), 1.0, float(zero), factor, zero)
    return _Scale(float(up), float(down), float(zero), factor, zero)


def _tidy(unit: str) -> str:
    """One spelling of what is written in many: signs, spaces, raised digits, micro."""
    unit = unicodedata.normalize("NFKC", unit)
    unit = unit.replace("\u2212", "-").replace("\u03bc", "u").replace("\u03a9", "ohm")
    return " ".join(unit.split())


def _example(kind: Kind) -> str:
    if not kind.si:
        return "'0.38' or '38 %'" if "percent" in kind.accepts else "a plain number"
    if kind.name == "temperature":
        return "K or degC, such as '25 degC'"
    if kind.stock == kind.si:
        return f"{kind.si}, such as '1 {kind.si}'"
    return f"{kind.si} or {kind.stock}, such as '1 {kind.stock}'"


def _needs(kind: Kind) -> str:
    return f"{kind.words} in {_example(kind)}" if kind.si else f"{kind.words}: {_example(kind)}"


def _other(dimension: Dimension, kind: Kind) -> str:
    """What a unit of another dimension measures, in words."""
    if dimension == (0, 0, 0, 0, 0, 0):
        return "a pure number"
    words = [k.words for k in KINDS.values() if k.dimension == dimension and k.words != kind.words]
    return words[0] if words else "something else"


def _mismatch(unit: str, dimension: Dimension, kind: Kind) -> UnitError:
    hint = ""
    pair = {kind.name, _other_name(dimension)}
    if kind.dimension == KINDS["viscosity"].dimension and "kinematic_viscosity" in pair:
        hint = (
            "A kinematic viscosity (cSt, mm2/s) times the density is the dynamic one: "
            "4 cSt at 1050 kg/m3 is 4.2 mPa*s"
        )
    elif kind.name == "kinematic_viscosity" and "viscosity" in pair:
        hint = (
            "A dynamic viscosity (mPa*s, cP) over the density is the kinematic one: "
            "4.2 mPa*s at 1050 kg/m3 is 4 cSt"
        )
    elif "mass_flow" in pair and "flow" in pair:
        hint = "Mass flow is density times volume flow"
    elif kind.name in ("heat_of_vaporisation", "heat_capacity") and dimension[5]:
        hint = "Divide the molar value by the molar mass"
    return UnitError(
        f"{unit!r} measures {_other(dimension, kind)}", allowed=_needs(kind), hint=hint
    )


def _other_name(dimension: Dimension) -> str:
    return next((name for name, kind in KINDS.items() if kind.dimension == dimension), "")


def _mark_error(unit: str, mark: str, kind: Kind) -> UnitError:
    """Why a unit of the right dimension does not fit the kind, and the cure."""
    plain = unit.split("(")[0].split("_")[0].strip()
    plain = plain[:-1] if mark in ("gauge", "absolute") and plain[-1:] in "ga" else plain
    plain = plain.strip()
    standard = f"{STANDARD_ATMOSPHERE:g} Pa"
    what = f"{unit!r} does not fit {kind.words}"
    hints = {
        "gauge": f"Add the ambient pressure ({standard} at the standard atmosphere) and write it "
        f"in {plain}(a)" if kind.name == "absolute_pressure" or kind.name == "vapour_pressure"
        else f"A difference is neither gauge nor absolute: write it in {plain}",
        "absolute": f"Subtract the ambient pressure ({standard} at the standard atmosphere) and "
        f"write it in {plain}",
        "temperature": "A difference is written in K: '5 K' or '5 delta_degC'",
        "difference": "A temperature is written in K or degC: '298.15 K' or '25 degC'",
        "cycle": "Revolutions are no shear rate or growth rate; write 1/s",
        "angular": "An angle per time is no rate of this kind; write 1/s",
        "dpi": "600 dpi is a pitch of 42.33 um: write the length",
        "needle": "A needle gauge stands for an inner diameter; write this length in um",
        "brix": "Degrees Brix are mass per cent of sucrose; write a mass fraction",
        "humidity": "Per cent of relative humidity is no fraction of a liquid",
    }  # fmt: skip
    hint = hints.get(mark, "Write '38 %' or 0.38 once the basis is the right one")
    return UnitError(what, allowed=_needs(kind), hint=hint)


def _accept(text: str, unit: Unit, kind: Kind) -> _Scale:
    if unit.dimension != kind.dimension:
        raise _mismatch(text, unit.dimension, kind)
    if unit.mark and unit.mark not in kind.accepts:
        raise _mark_error(text, unit.mark, kind)
    if unit.mark == "gauge" and "absolute" in kind.accepts:
        return _scale(unit.factor, Fraction(STANDARD_ATMOSPHERE))
    return _scale(unit.factor, unit.zero)


class _Unknown(Exception):
    """A word of a unit that the table lacks."""


def _word(word: str, registry: Any) -> tuple[Fraction, Dimension]:
    """Factor and dimension of one word, from the table or else from a pint registry."""
    found = SINGLE.get(word) or PREFIXED.get(word)
    if found is not None:
        return found[0].factor, found[0].dimension
    prefix = PREFIXES.get(word[:1].replace("µ", "u"))
    found = PREFIXED.get(word[1:])
    if prefix is not None and found is not None:
        return found[0].factor * Fraction(10) ** prefix[0], found[0].dimension
    if word in REFUSED:
        raise UnitError(f"{word!r} has several meanings", hint=f"Write {REFUSED[word]}")
    if registry is None:
        raise _Unknown(word)
    try:
        factor, roots = registry.get_root_units(registry.parse_units(word))
        scale, dimension = _from_roots(factor, dict(roots.unit_items() if hasattr(roots, "unit_items") else roots._units.items()))
    except Exception:  # pint raises many classes for text that it cannot read
        known = [*SINGLE, *PREFIXED, "um", "mm", "mPas", "cP", "cSt", "degC", "kPa", "mN", "kHz"]
        raise UnitError(f"unit {word!r} is not known", choices=nearest(word, known)) from None
    return Fraction(scale), dimension


def _tokens(text: str) -> list[tuple[str, str, int]]:
    tokens, at = [], 0
    while at < len(text):
        match = _TOKEN.match(text, at)
        if match is None or match.end() == at:
            raise UnitError(f"unit {text!r} cannot be read at {text[at:]!r}")
        at = match.end()
        if match["word"]:
            power = (match["power"] or "1").lstrip("^*")
            if len(power.lstrip("+-")) > 2:
                raise UnitError(f"unit {text!r} has the power {power}")
            tokens.append(("word", match["word"], int(power)))
        elif match["one"]:
            tokens.append(("one", "1", 1))
        else:
            tokens.append(("sign", match["sign"], 0))
        while at < len(text) and text[at] == " ":
            at += 1
    return tokens


def _factors(text: str, registry: Any, *, low_bar: bool) -> list[tuple[str, int]]:
    """Words and powers of a compound unit.

    With `low_bar`, a factor joined by a space or a dot stays below the preceding slash,
    as most people mean "W/m K"; otherwise reading runs strictly from left to right.
    """
    words: list[tuple[str, int]] = []
    signs = [1]  # sign of each open bracket
    sign, slashed, expect = 1, False, True
    for form, value, power in _tokens(text):
        if form != "sign" or value == "(":
            if not expect and not (low_bar and slashed):
                sign = 1
            if value == "(" and form == "sign":
                signs.append(signs[-1] * sign)
                sign, slashed, expect = 1, False, True
                continue
            if form == "word":
                words.append((value, signs[-1] * sign * power))
            expect = False
        elif value == ")":
            if len(signs) == 1 or expect:
                raise UnitError(f"unit {text!r} has an unmatched bracket")
            signs.pop()
            # What follows a bracket is joined to it anew.
            sign, slashed = 1, False
        else:
            if expect:
                raise UnitError(f"unit {text!r} has two signs in a row")
            if value == "/":
                sign, slashed = -1, True
            elif value in "*×" or not (low_bar and slashed):
                sign, slashed = 1, False
            expect = True
    if expect or len(signs) > 1:
        raise UnitError(f"unit {text!r} is not complete")
    return words


def _compound(text: str, kind: Kind, registry: Any) -> _Scale:
    first: UnitError | None = None
    for low_bar in (False, True):
        factor, dimension = Fraction(1), (0, 0, 0, 0, 0, 0)
        for word, power in _factors(text, registry, low_bar=low_bar):
            if abs(power) > 12:
                raise UnitError(f"unit {text!r} has the power {power}")
            one, its = _word(word, registry)
            factor *= one**power
            dimension = tuple(a + b * power for a, b in zip(dimension, its, strict=True))  # type: ignore[assignment] # six stay six
        if dimension == kind.dimension:
            return _scale(factor)
        first = first or _mismatch(text, dimension, kind)
    assert first is not None
    raise first


@lru_cache(maxsize=2048)
def _resolve(text: str, kind: Kind) -> _Scale | None:
    """How a unit becomes SI; None if only pint could tell, which is never cached."""
    if text in REFUSED:
        raise UnitError(f"{text!r} has several meanings", hint=f"Write {REFUSED[text]}")
    whole = WHOLE.get(text)
    if whole is not None:
        return _accept(text, whole, kind)
    try:
        return _compound(text, kind, None)
    except _Unknown:
        return None


def _to_scale(unit: str, kind: Kind) -> _Scale:
    text = _tidy(unit)
    scale = _resolve(text, kind)
    if scale is None:
        scale = _compound(text, kind, _application())
    return scale


def _convert(value: Any, unit: str, kind: Kind) -> Any:
    """SI value of a float or array in a unit given as text; errors do not name the argument."""
    if len(unit) > _LONGEST:
        raise UnitError(f"unit {unit[:20]!r}... is too long")
    text = unit.strip()
    if not text:
        if kind.si:
            raise UnitError("no unit is given", allowed=_needs(kind),
                            hint="A bare number, without quotes, is taken as SI")  # fmt: skip
        return value
    if text in NEEDLE_WORDS:
        return _needle(value, text, kind)
    scale = _dots(value, kind) if text == "dpi" and kind.name == "pitch" else None
    return _to_scale(text, kind)(value) if scale is None else scale


def _needle(value: Any, text: str, kind: Kind) -> Any:
    if kind.dimension != KINDS["length"].dimension:
        raise UnitError(f"{text!r} is a needle gauge, an inner diameter", allowed=_needs(kind))
    if "needle" not in kind.accepts:
        raise _mark_error(text, "needle", kind)
    found = [NEEDLE_GAUGES.get(number) for number in np.ravel(value).tolist()]
    if None in found:
        raise UnitError(
            "no inner diameter is on record for that needle gauge",
            allowed=f"whole numbers from {min(NEEDLE_GAUGES)} to {max(NEEDLE_GAUGES)}",
            hint="Write the measured inner diameter, such as '110 um'",
        )
    metres = np.array(found, dtype=float).reshape(np.shape(value)) / 1e6
    return metres if isinstance(value, np.ndarray) else float(metres)


def _dots(value: Any, kind: Kind) -> Any:
    if np.any(np.equal(value, 0)):
        raise UnitError("0 dpi is no pitch", allowed=_needs(kind))
    return 0.0254 / value


def _split(text: str) -> tuple[float, str, str]:
    """Number, its digits and unit of a string such as "60 um"; errors name no argument."""
    if len(text) > _LONGEST:
        raise BadInput(f"text of {len(text)} characters is too long for a number with a unit")
    plain = text.strip().replace("\u2212", "-")
    comma = _COMMA.match(plain)
    if comma is not None:
        point = f"{comma[1] or '0'}.{plain[comma.start(2):]}"
        more = ""
        if len(comma[2]) == 3:
            more = f", or '{comma[1]}{plain[comma.start(2):]}' if the comma marks thousands"
        raise BadInput("a comma is not read as a decimal sign", hint=f"Write '{point}'{more}")
    match = _NUMBER.match(plain)
    if match is None:
        raise BadInput(
            "no number is at its start", hint="Write a number and a unit, such as '60 um'"
        )
    number = float(match[0])
    if math.isinf(number):
        raise Unphysical(f"the number {match[0]} is too large")
    return number, match[0], plain[match.end() :].strip()


def _exact(number: float, digits: str, scale: _Scale) -> float:
    """SI value of decimal digits, rounded once: "4.2 mPa*s" is 0.0042 to the last bit."""
    if number == 0.0:  # also digits too small for a float, whose fraction could be vast
        return float(scale.exact_zero)
    try:
        return float(Fraction(digits) * scale.exact + scale.exact_zero)
    except OverflowError:
        raise Unphysical(f"the number {digits} is too large in SI") from None


@lru_cache(maxsize=4096)
def _text(text: str, kind: Kind) -> tuple[float, bool] | None:
    """SI value of a string and whether it had a unit; None if pint must be asked."""
    number, digits, unit = _split(text)
    if not unit or unit in NEEDLE_WORDS or (unit == "dpi" and kind.name == "pitch"):
        return float(_convert(number, unit, kind)), bool(unit)
    scale = _resolve(_tidy(unit), kind)
    return None if scale is None else (_exact(number, digits, scale), True)


# --- input ---------------------------------------------------------------------------


def _shown(value: Any) -> str:
    try:
        text = repr(value)
    except Exception:  # a foreign object may fail to show itself
        text = f"<{type(value).__name__}>"
    return text if len(text) <= 60 else text[:57] + "..."


def _named(name: str, value: Any, error: BadInput) -> NoReturn:
    raise type(error)(
        f"{name} = {_shown(value)}: {error.what}",
        allowed=error.allowed,
        choices=error.choices,
        hint=error.hint,
    ) from None


def _bad(value: Any, why: str, kind: Kind, hint: str = "") -> BadInput:
    return BadInput(why, allowed=f"a number [{kind.si or '1'}], an array, or {_needs(kind)}",
                    hint=hint)  # fmt: skip


def _array(value: np.ndarray[Any, Any], kind: Kind) -> Any:
    """A float64 array, or a float for a 0-d one."""
    if isinstance(value, np.ma.MaskedArray):
        if np.ma.is_masked(value):
            raise _bad(value, "masked elements have no value", kind, "Fill them with NaN")
        value = value.data
    letter = value.dtype.kind
    if letter not in "fiu":
        what = {"b": "booleans", "c": "complex numbers", "U": "text", "S": "text", "T": "text",
                "O": "objects", "M": "dates", "m": "time spans", "V": "records"}  # fmt: skip
        hint = "Pass a list of strings, or (array, 'unit')" if letter in "UTO" else ""
        raise _bad(value, f"the array holds {what.get(letter, value.dtype.name)}", kind, hint)
    with np.errstate(over="ignore"):
        result = np.asarray(value, dtype=np.float64)
    return result if result.ndim else float(result)


def _is_series(value: Any) -> bool:
    pandas = sys.modules.get("pandas")
    return pandas is not None and isinstance(value, pandas.Series)


def _series(value: Any, kind: Kind) -> Any:
    """A Series as float64 with its index; missing values become NaN."""
    import pandas as pd

    numeric = pd.api.types.is_numeric_dtype(value.dtype)
    if not numeric or pd.api.types.is_bool_dtype(value.dtype) or pd.api.types.is_complex_dtype(
        value.dtype
    ):
        raise _bad(value, f"the Series holds {value.dtype}", kind,
                   "Convert it to SI numbers first")  # fmt: skip
    if value.dtype == np.float64:
        return value
    numbers = value.to_numpy(dtype=np.float64, na_value=np.nan)
    return pd.Series(numbers, index=value.index, name=value.name)


def _from_roots(factor: Any, roots: dict[str, Any]) -> tuple[float, Dimension]:
    """SI factor and dimension of pint's root units; KeyError for roots that SI has not."""
    places = {"meter": 0, "gram": 1, "second": 2, "ampere": 3, "kelvin": 4, "mole": 5}
    dimension = [0, 0, 0, 0, 0, 0]
    result = float(factor)
    for root, power in roots.items():
        if root == "radian":
            continue
        whole = int(power)
        if whole != power:
            raise KeyError(root)
        dimension[places[root]] = whole
    if dimension[1]:
        result *= 1000.0 ** -dimension[1]
    return result, tuple(dimension)  # type: ignore[return-value] # always six


def _quantity(value: Any, kind: Kind) -> Any:
    """SI magnitude of a Quantity of any registry."""
    registry = value._REGISTRY
    magnitude, _ = _any(value.magnitude, kind, 1)
    try:
        names = dict(value.unit_items())
        factor, roots = registry.get_root_units(value.units)
        roots = dict(roots._units)
        scale, dimension = _from_roots(factor, roots)
    except Exception:  # registries of other design, logarithmic units, currencies ...
        raise UnitError("its unit cannot be turned into SI", allowed=_needs(kind)) from None
    if dimension != kind.dimension:
        raise _mismatch(str(value.units), dimension, kind)
    if kind.dimension == KINDS["temperature"].dimension:
        return _quantity_temperature(magnitude, names, value, scale, kind)
    if roots.get("radian") == 1 and "angular" in kind.accepts:
        scale /= 2 * math.pi
    if scale == 1.0:
        return magnitude
    below = 1 / scale
    return magnitude / below if below == round(below) else magnitude * scale


def _quantity_temperature(
    magnitude: Any, names: dict[str, Any], value: Any, scale: float, kind: Kind
) -> Any:
    unit = next(iter(names))
    if len(names) == 1:
        if unit.startswith("delta_") and kind.name == "temperature":
            raise _mark_error(unit, "difference", kind)
        if unit.startswith("degree_") and kind.name != "temperature":
            raise _mark_error(unit, "temperature", kind)
        if unit == "degree_Celsius":
            return magnitude + ZERO_CELSIUS
        if unit == "degree_Fahrenheit":
            return WHOLE["degF"].factor.numerator * (magnitude + 459.67) / 9
        if unit.startswith("degree_") and unit != "degree_Rankine":
            return value.to("kelvin").magnitude
    return magnitude * scale


def _sequence(value: Sequence[Any], kind: Kind, depth: int) -> tuple[Any, Asked | None]:
    if depth > _DEEPEST:
        raise BadInput(f"lists are nested more than {_DEEPEST} deep")
    types = set(map(type, value))
    if types <= {float, int}:
        try:
            return np.array(value, dtype=np.float64), None
        except OverflowError:
            raise Unphysical("an element is too large") from None
    read_all = [_any(element, kind, depth + 1) for element in value]
    parts = [part for part, _ in read_all]
    carried = [asked for _, asked in read_all if asked is not None]
    if carried and len(carried) < len(parts):
        raise _bad(value, "some elements carry a unit and some do not", kind,
                   "For one unit write ([1, 2, 3], 'um')")  # fmt: skip
    if len({np.shape(part) for part in parts}) > 1:
        raise _bad(value, "its rows differ in length", kind)
    asked = next((one for one in carried if one.registry is not None), None)
    return np.array(parts, dtype=np.float64), asked or (_ASKED if carried else None)


def _any(value: Any, kind: Kind, depth: int = 0) -> tuple[Any, Asked | None]:
    """SI value and how it was asked; errors do not name the argument."""
    if type(value) is float:
        return value, None
    if isinstance(value, str):
        found = _text(str(value), kind)
        if found is None:
            number, digits, unit = _split(value)
            return _exact(number, digits, _to_scale(unit, kind)), _ASKED
        return found[0], _ASKED if found[1] else None
    if isinstance(value, (bool, np.bool_)):
        raise _bad(value, "a boolean is no number", kind)
    if isinstance(value, (Real, Decimal)):
        try:
            return float(value), None
        except (OverflowError, ValueError):
            raise Unphysical("the number is too large") from None
    if hasattr(value, "_REGISTRY") and hasattr(value, "magnitude"):
        return _quantity(value, kind), Asked(value._REGISTRY)
    if isinstance(value, np.ndarray):
        return _array(value, kind), None
    if isinstance(value, tuple) and len(value) == 2 and isinstance(value[1], str):
        if not isinstance(value[0], str):
            number, asked = _any(value[0], kind, depth + 1)
            if asked is not None:
                raise _bad(value, "it carries two units", kind)
            if _is_series(number):
                number = number.to_numpy()
            return _convert(number, value[1], kind), _ASKED
        if _NUMBER.fullmatch(value[0].strip()) and not _NUMBER.match(value[1].strip()):
            raise _bad(value, "its number is text", kind,
                       f"Write ({value[0].strip()}, {value[1]!r})")  # fmt: skip
    if isinstance(value, (list, tuple, range)):
        if len(value) == 2 and isinstance(value[1], str) and not isinstance(value[0], str):
            raise _bad(value, "a list mixes a number and text", kind,
                       "A value with its unit is a tuple, such as (60, 'um')")  # fmt: skip
        return _sequence(value, kind, depth)
    if _is_series(value):
        return _series(value, kind), None
    hint = "Pass its numbers as a float or a numpy array in SI, or as (numbers, 'unit')"
    raise _bad(value, f"a {type(value).__name__} is no number", kind, hint)


# --- limits --------------------------------------------------------------------------


def kelvin_hint(value: Any) -> str:
    """The reminder that belongs to an error about a bare temperature below 150 K.

    Parameters
    ----------
    value : float or array
        A bare temperature [K].

    Returns
    -------
    str
        Empty where no element lies below 150 K.

    Examples
    --------
    >>> kelvin_hint(25.0)
    "kelvin expected; 25 degC is 298.15 K, written '25 degC' or 298.15"
    """
    low = np.asarray(value, dtype=float)
    low = low[low < _COLD]
    if low.size == 0:
        return ""
    first = float(low.flat[0])
    kelvin = f"{first + ZERO_CELSIUS:g}"
    return f"kelvin expected; {first:g} degC is {kelvin} K, written '{first:g} degC' or {kelvin}"


def _inside(value: Any, domain: Domain) -> bool:
    """True if a float or array surely lies in its domain; False asks for the slow check."""
    if type(value) is float:
        low = high = value
    elif value.size == 0:
        return True
    else:
        low, high = value.min(), value.max()
    if domain == "> 0":
        return bool(0.0 < low and high < math.inf)
    if domain == ">= 0":
        return bool(0.0 <= low and high < math.inf)
    if domain == "0..1":
        return bool(0.0 <= low and high <= 1.0)
    return bool(-math.inf < low and high < math.inf)


def _first(value: Any, bad: Any) -> float:
    return float(value) if np.ndim(value) == 0 else float(np.asarray(value)[bad].flat[0])


def _slip(value: float, slips: Iterable[Slip]) -> str:
    for slip in slips:
        if slip.low <= value <= slip.high:
            meant = value * slip.factor + slip.zero
            return f"{value:g} {slip.unit} was probably meant, which is {meant:g}"
    return ""


def _limits(
    name: str, value: Any, kind: Kind, domain: Domain, plausible: bool, bare: bool
) -> None:
    """Raise Unphysical outside the domain and ImplausibleValue outside the window."""
    plain = value.to_numpy() if _is_series(value) else value
    if not _inside(plain, domain):
        try:
            check_domain(name, plain, domain)
        except Unphysical as error:
            hint = ""
            if kind.name == "temperature" and bare:
                hint = kelvin_hint(plain)
            elif domain == "0..1":
                bad = np.asarray(plain) > 1
                hint = _slip(_first(plain, bad), kind.slips or _PERCENT) if bad.any() else ""
            raise Unphysical(error.what, allowed=error.allowed, hint=hint) from None
    if plausible and kind.plausible is not None:
        _check_plausible(name, plain, kind, bare)


_PERCENT: Final = (Slip(1.0, 100.0, "%", 0.01),)


def _check_plausible(name: str, value: Any, kind: Kind, bare: bool) -> None:
    assert kind.plausible is not None
    low, high = kind.plausible
    if kind.name == "temperature" and bare:
        low = _COLD
    bad = (np.asarray(value) < low) | (np.asarray(value) > high)
    if not bad.any():
        return
    first = _first(value, bad)
    count = f" (one of {int(bad.sum())} elements)" if np.ndim(value) else ""
    if kind.name == "temperature" and first < _COLD:
        hint = kelvin_hint(first)
    else:
        hint = _slip(first, kind.slips)
    raise ImplausibleValue(
        f"{name} = {first:g} {kind.si or ''}".rstrip() + f"{count} is not plausible for {kind.words}",
        allowed=f"{low:g} to {high:g} {kind.si}".rstrip(),
        hint=". ".join(filter(None, (hint, "plausible=False lets it pass"))),
    )


# --- the three doors -------------------------------------------------------------------


def read(
    value: Any,
    kind: str | Kind,
    name: str,
    *,
    domain: Domain | None = None,
    plausible: bool = False,
) -> tuple[Any, Asked | None]:
    """Turn any form of input into SI, and say whether it carried a unit.

    Parameters
    ----------
    value : float, array, str, tuple, list, Series or Quantity
        The input; bare numbers are SI.
    kind : str
        Name of the kind or argument word, such as ``"viscosity"``.
    name : str
        How an error calls the argument.
    domain : str, optional
        ``"> 0"``, ``">= 0"``, ``"0..1"`` or ``"any"``; by default the kind's own.
    plausible : bool, optional
        Whether values that no liquid has are refused, with the likely slip named.

    Returns
    -------
    si : float, numpy.ndarray or pandas.Series
        A float for every scalar, float64 for arrays; a Series keeps its index.
    asked : Asked or None
        None for bare input.

    Raises
    ------
    BadInput
        For a form that is no number: bool, complex, text without a number, objects.
    UnitError
        For an unknown, ambiguous or unsuitable unit.
    Unphysical
        Outside the domain, and for infinity.
    ImplausibleValue
        Outside the plausibility window, if asked for.

    Notes
    -----
    NaN passes as NaN. A fraction of one of a compound unit is read as written, from left to
    right; if that misses the declared dimension, a factor joined by a space or dot is
    taken to stand below the slash, as in "W/m K".

    Examples
    --------
    >>> read("60 um", "length", "diameter")
    (6e-05, Asked())
    >>> read(6e-05, "length", "diameter")
    (6e-05, None)
    """
    its = kind if type(kind) is Kind else _kind(kind)  # type: ignore[arg-type] # str remains
    limit = domain or its.domain
    try:
        si, asked = _any(value, its)
    except BadInput as error:
        _named(name, value, error)
    except RecursionError:
        raise BadInput(f"{name} is nested too deeply") from None
    if plausible or type(si) is not float or not _inside(si, limit):
        _limits(name, si, its, limit, plausible, asked is None)
    return si, asked


def to_si(value: Any, kind: str | Kind, name: str = "value", **options: Any) -> Any:
    """SI value of any form of input; see :func:`read`.

    Parameters
    ----------
    value : float, array, str, tuple, list, Series or Quantity
        The input; bare numbers are SI.
    kind : str
        Name of the kind or argument word.
    name : str
        How an error calls the argument.
    **options
        ``domain`` and ``plausible`` of :func:`read`.

    Returns
    -------
    float, numpy.ndarray or pandas.Series
        The SI value.

    Examples
    --------
    >>> to_si("4.2 cP", "viscosity")
    0.0042
    """
    return read(value, kind, name, **options)[0]


def give(si: Any, kind: str | Kind, asked: Asked | None) -> Any:
    """Hand a result over in the way it was asked for.

    Parameters
    ----------
    si : float, numpy.ndarray or pandas.Series
        The result in SI.
    kind : str
        Its kind or word.
    asked : Asked or None
        From :func:`read`.

    Returns
    -------
    float, numpy.ndarray, pandas.Series or pint.Quantity
        `si` itself if `asked` is None, for pure numbers, and for a Series, which pint
        cannot hold; else a Quantity in the kind's stock unit.

    Examples
    --------
    >>> print(give(0.0042, "viscosity", read("25 degC", "temperature", "T")[1]))
    4.2 millipascal * second
    """
    if asked is None:
        return si
    its = kind if type(kind) is Kind else _kind(kind)  # type: ignore[arg-type] # str remains
    if its.plain or _is_series(si):
        return si
    registry = asked.registry or _application()
    scale, container = _stock(its)
    value = si - its.zero if its.zero else si
    if scale.down != 1.0:
        value = value * scale.down
    if scale.up != 1.0:
        value = value / scale.up
    return registry.Quantity(value, container)


# --- pint ----------------------------------------------------------------------------

# Pint builds its application registry at first use and breaks when several threads do.
_LOCK: Final = threading.RLock()
_ready: weakref.ref[Any] | None = None


def _application() -> Any:
    """Pint's application registry of this moment, complete."""
    global _ready
    pint = sys.modules.get("pint")
    if pint is not None and _ready is not None:
        registry = pint.get_application_registry().get()
        if registry is _ready():
            return registry
    with _LOCK:
        import pint as loaded

        registry = loaded.get_application_registry().get()
        registry.get_root_units("meter")
        _ready = weakref.ref(registry)
        return registry


@cache
def _stock(kind: Kind) -> tuple[_Scale, Any]:
    """Scale and label of a kind's stock unit; the label holds names, no registry."""
    with _LOCK:
        from pint.util import UnitsContainer

        if kind.name == "temperature":
            return _scale(Fraction(1)), UnitsContainer({"degree_Celsius": 1})
        names: dict[str, int] = {}
        for word, power in _factors(kind.stock, None, low_bar=False):
            names[_long_name(word)] = names.get(_long_name(word), 0) + power
        return _compound(kind.stock, kind, None), UnitsContainer(names)


def _long_name(word: str) -> str:
    found = SINGLE.get(word) or PREFIXED.get(word)
    if found is not None:
        return found[1]
    return PREFIXES[word[0]][1] + PREFIXED[word[1:]][1]
