"""The boundary rule: any form of input to SI floats and arrays, and results back in units.

The only file that knows pint. Bare numbers and arrays are SI. A unit is carried by a string
``"60 um"``, a tuple ``(60, "um")``, a list of such strings, or a Quantity of any registry,
known by its attributes. Nothing of a registry is kept here: its units, contexts and the
choice of the application registry may change between two calls.
"""

from __future__ import annotations

import math
import sys
import threading
import weakref
from collections.abc import Sequence
from functools import cache
from types import ModuleType
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit.errors import BadInput, UnitError, Unphysical
from dropkit.unit_arrays import float_array, float_series, is_real, is_series
from dropkit.unit_errors import bad_form, mark_error, mismatch, named, needs, shown
from dropkit.unit_limits import check_domain_of, check_plausible, inside, kelvin_hint
from dropkit.unit_table import (
    KINDS,
    NONE,
    RATE,
    TEMPERATURE,
    ZERO_CELSIUS,
    Dimension,
    Kind,
    kind_of,
)
from dropkit.validity import Domain

if TYPE_CHECKING:
    from dropkit.unit_text import Scale

__all__ = ["Asked", "give", "kelvin_hint", "read", "single", "to_si"]

_DEEPEST: Final = 16  # levels of nested lists


class Asked:
    """How a result was asked for: with units, and in which registry.

    Parameters
    ----------
    registry : pint.UnitRegistry, optional
        The registry of the Quantity that carried the unit; None for pint's application
        registry. It is held weakly, and a pickled or copied `Asked` means the latter.
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


@cache
def _grammar() -> ModuleType:
    """The reader of text, loaded with the first unit: bare numbers do without it."""
    import dropkit.unit_text as grammar

    return grammar


# --- pint --------------------------------------------------------------------------------

# Pint builds its application registry at first use and breaks when several threads do so.
_LOCK: Final = threading.RLock()
_complete: weakref.ref[Any] | None = None


def _application() -> Any:
    """Pint's application registry of this moment, completely built."""
    global _complete
    known = _complete
    pint = sys.modules.get("pint")
    if pint is not None and known is not None:
        registry: Any = pint.application_registry.get()
        if registry is known():
            return registry
    with _LOCK:
        import pint as loaded

        application: Any = loaded.application_registry
        registry = application.get()
        registry.get_root_units("meter")
        _complete = weakref.ref(registry)
        return registry


@cache
def _stock(kind: Kind) -> tuple[Scale, Any]:
    """Scale and label of a kind's stock unit; the label is names only, of no registry."""
    with _LOCK:
        from pint.util import UnitsContainer

        scale, names = _grammar().long_names(kind)
        return scale, UnitsContainer(names)


_ROOTS: Final = {"meter": 0, "gram": 1, "second": 2, "ampere": 3, "kelvin": 4, "mole": 5}


def _si_of_roots(factor: Any, roots: Any) -> tuple[float, Dimension, int]:
    """SI factor, dimension and power of radian of pint's root units.

    KeyError for a root that SI has not.
    """
    powers = [0, 0, 0, 0, 0, 0]
    radian = 0
    for root, power in roots.items():
        whole = int(power)
        if whole != power:
            raise KeyError(root)
        if root == "radian":
            radian = whole
        else:
            powers[_ROOTS[root]] = whole
    m, g, s, a, k, mol = powers
    return float(factor) * 1000.0**-g if g else float(factor), (m, g, s, a, k, mol), radian


def _lookup(word: str) -> tuple[float, Dimension] | None:
    """A single word by pint's application registry; None if it cannot tell."""
    registry = _application()
    try:
        unit = registry.parse_units(word)
        if registry.Quantity(0.0, unit).to_root_units().magnitude != 0.0:
            return None  # a scale with an offset, or a logarithmic one
        factor, roots = registry.get_root_units(unit)
        return _si_of_roots(factor, roots._units)[:2]
    except Exception:  # pint raises many classes for words that it cannot read
        return None


def _magnitude(value: Any, kind: Kind) -> Any:
    """SI magnitude of a Quantity of any registry."""
    magnitude, _ = _any(value.magnitude, kind, 1)
    try:
        units = value._units  # names and powers; building a Unit of them takes its time
        factor, roots = value._REGISTRY.get_root_units(units)
        scale, dimension, radian = _si_of_roots(factor, roots._units)
        linear = value._is_multiplicative  # neither an offset nor a logarithm
    except Exception:  # other designs, currencies, pixels ...
        raise UnitError("its unit cannot be turned into SI", allowed=needs(kind)) from None
    if dimension != kind.dimension:
        raise mismatch(str(units), dimension, kind)
    if dimension == TEMPERATURE:
        return _kelvin(magnitude, scale, value, linear, kind)
    if not linear:
        raise UnitError(f"{str(units)!r} is no linear unit", allowed=needs(kind))
    if radian and dimension in (NONE, RATE):
        if not kind.accepts & {"angle", "angular"}:
            raise mark_error(str(units), "angular" if dimension == RATE else "angle", kind)
        if "angular" in kind.accepts:
            scale /= 2 * math.pi  # one revolution is one cycle
    if scale == 1.0:
        return magnitude
    below = 1.0 / scale
    return magnitude / below if below == round(below) else magnitude * scale


def _kelvin(magnitude: Any, scale: float, value: Any, linear: bool, kind: Kind) -> Any:
    """A temperature or a difference; UnitError where one was given for the other."""
    name = "*".join(word for word, _ in value.unit_items())
    if linear:
        if name.startswith("delta_") and kind.name == "temperature":
            raise mark_error(name, "difference", kind)
        return magnitude * scale
    if kind.name != "temperature":
        raise mark_error(name, "temperature", kind)
    if name == "degree_Celsius":
        return magnitude + ZERO_CELSIUS
    zero = value._REGISTRY.Quantity(0.0, value._units).to_root_units().magnitude
    return magnitude * scale + float(zero)


# --- forms of input ----------------------------------------------------------------------


def _sequence(value: Sequence[Any], kind: Kind, depth: int) -> tuple[Any, Asked | None]:
    if depth > _DEEPEST:
        raise BadInput(f"lists are nested more than {_DEEPEST} deep")
    types = set(map(type, value))
    if all(issubclass(one, (float, int, np.floating, np.integer)) for one in types) and not any(
        issubclass(one, (bool, np.timedelta64)) for one in types
    ):
        try:
            return np.array(value, dtype=np.float64), None
        except OverflowError:
            raise Unphysical("an element is too large") from None
    if len(value) == 2 and isinstance(value[1], str) and not isinstance(value[0], str):
        raise bad_form("a list mixes a number and text", kind,
                   "A value with its unit is a tuple, such as (60, 'um')")  # fmt: skip
    both = [_any(element, kind, depth + 1) for element in value]
    parts = [part.to_numpy() if is_series(part) else part for part, _ in both]
    carried = [asked for _, asked in both if asked is not None]
    if carried and len(carried) < len(parts):
        raise bad_form("some elements carry a unit and some do not", kind,
                   "One unit for all is written ([1, 2, 3], 'um')")  # fmt: skip
    if len({np.shape(part) for part in parts}) > 1:
        raise bad_form("its elements differ in shape", kind)
    first = next((asked for asked in carried if asked.registry is not None), None)
    return np.array(parts, dtype=np.float64), first or (_ASKED if carried else None)


def _pair(value: tuple[Any, str], kind: Kind, depth: int) -> tuple[Any, Asked]:
    """(60, "um"): one number or array with its unit."""
    plain = KINDS["ratio"] if kind.plain else kind
    number, asked = _any(value[0], plain, depth + 1)
    if asked is not None:
        raise bad_form("it carries two units", kind)
    if is_series(number):
        si = _grammar().convert(number.to_numpy(), value[1], kind, _lookup)
        return type(number)(si, index=number.index, name=number.name), _ASKED
    return _grammar().convert(number, value[1], kind, _lookup), _ASKED


def _any(value: Any, kind: Kind, depth: int = 0) -> tuple[Any, Asked | None]:
    """SI value and how it was asked; errors do not name the argument."""
    if type(value) is float:
        return value, None
    if isinstance(value, str):
        si, carried = _grammar().quantity(str(value), kind, _lookup)
        return si, _ASKED if carried else None
    if hasattr(value, "_REGISTRY") and hasattr(value, "magnitude"):
        return _magnitude(value, kind), Asked(value._REGISTRY)
    if isinstance(value, (bool, np.bool_)):
        raise bad_form("a boolean is no number", kind)
    if is_real(value):
        try:
            return float(value), None
        except (OverflowError, ValueError):
            raise Unphysical("the number is too large") from None
    if isinstance(value, np.ndarray):
        return float_array(value, kind), None
    if isinstance(value, (list, tuple, range)):
        if isinstance(value, tuple) and len(value) == 2 and isinstance(value[1], str):
            if not isinstance(value[0], str):
                return _pair(value, kind, depth)
            if not value[1].strip()[:1].isdigit():
                raise bad_form("its number is text", kind, "Write the number without quotes")
        return _sequence(value, kind, depth)
    if is_series(value):
        return float_series(value, kind), None
    raise bad_form(f"a {type(value).__name__} is no number", kind,
               "Pass a float or a numpy array in SI, or (numbers, 'unit')")  # fmt: skip


# --- the three doors -----------------------------------------------------------------------


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
        Name of the kind or an argument word, such as ``"viscosity"``.
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
        For what is no number: bool, complex, text without a number, objects.
    UnitError
        For an unknown, ambiguous or unsuitable unit.
    Unphysical
        Outside the domain, and for infinity; NaN passes.
    ImplausibleValue
        Outside the plausibility window, if asked for.

    Examples
    --------
    >>> read("60 um", "length", "diameter")
    (6e-05, Asked())
    >>> read(6e-05, "length", "diameter")
    (6e-05, None)
    """
    its = kind if isinstance(kind, Kind) else kind_of(kind)[0]
    limit = domain or its.domain
    if type(value) is float:
        si: Any = value
        asked: Asked | None = None
    else:
        try:
            si, asked = _any(value, its)
        except BadInput as error:
            named(name, value, error)
    plain: Any = si
    if type(si) is not float and is_series(si):
        plain = si.to_numpy()
    if not inside(plain, limit):
        check_domain_of(name, plain, its, limit, shown(value) if asked else "")
    if plausible:
        check_plausible(name, plain, its, shown(value) if asked else "")
    return si, asked


def to_si(value: Any, kind: str | Kind, name: str = "value", **options: Any) -> Any:
    """SI value of any form of input; `read` without the note on units.

    Parameters
    ----------
    value : float, array, str, tuple, list, Series or Quantity
        The input; bare numbers are SI.
    kind : str
        Name of the kind or an argument word.
    name : str
        How an error calls the argument.
    **options
        ``domain`` and ``plausible`` of `read`.

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


def single(value: Any, kind: str | Kind, name: str = "value", **options: Any) -> float:
    """SI value of one number in any form; see :func:`read`.

    Parameters
    ----------
    value : float, str, tuple or Quantity
        One number; a bare one is SI.
    kind : str
        Name of the kind or argument word.
    name : str
        How an error calls the argument.
    **options
        ``domain`` and ``plausible`` of :func:`read`.

    Returns
    -------
    float
        The SI value.

    Raises
    ------
    BadInput
        For several numbers, for NaN, and as :func:`read` does.

    Examples
    --------
    >>> single("25 degC", "temperature", "at")
    298.15
    """
    number = read(value, kind, name, **options)[0]
    if type(number) is not float or number != number:
        raise BadInput(f"{name} is {shown(value)}", allowed="one number, not NaN")
    return number


def give(si: Any, kind: str | Kind, asked: Asked | None) -> Any:
    """Hand a result over in the way it was asked for.

    Parameters
    ----------
    si : float, numpy.ndarray or pandas.Series
        The result [SI].
    kind : str
        Its kind or word.
    asked : Asked or None
        From `read`.

    Returns
    -------
    float, numpy.ndarray, pandas.Series or pint.Quantity
        `si` itself if `asked` is None, for pure numbers, and for a Series, which pint
        cannot hold; else a Quantity in the kind's stock unit.

    Examples
    --------
    >>> asked = read("25 degC", "temperature", "temperature")[1]
    >>> print(give(0.0042, "viscosity", asked))
    4.2 millipascal * second
    """
    if asked is None:
        return si
    its = kind if isinstance(kind, Kind) else kind_of(kind)[0]
    if its.plain or is_series(si):
        return si
    registry = asked.registry or _application()
    scale, label = _stock(its)
    for name in label:
        # A registry learns a prefixed unit when it first meets it, and formats only what it knows.
        if name not in registry._units:
            registry.get_name(name)
    return registry.Quantity(scale.back(si), label)
