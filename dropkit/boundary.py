"""`physical`: an SI core becomes a function that takes any form of input.

The core is plain arithmetic on SI floats or arrays; the `Boundary` around it reads the
input, checks dimension and domain, and gives the result back in a unit if any argument
had one. The core stays reachable as ``.si``.
"""

from __future__ import annotations

import functools
import inspect
import math
import warnings
from collections.abc import Callable, Mapping
from typing import Any, Final, Generic, ParamSpec, Protocol, TypeAlias, TypeVar, overload

import numpy as np

from dropkit.errors import BadInput, DropkitError, DropkitWarning
from dropkit.unit_table import NOMENCLATURE, Kind
from dropkit.units import Asked, give, kind_of, read
from dropkit.validity import Domain

__all__ = ["Boundary", "physical"]

P = ParamSpec("P")
R = TypeVar("R")
R_co = TypeVar("R_co", covariant=True)

Returns: TypeAlias = str | tuple[str, ...] | Mapping[str, str] | None

# Open bounds for the fast check: low < value < high; NaN and the ends go the long way.
_BOUNDS: Final[dict[str, tuple[float, float]]] = {
    "> 0": (0.0, math.inf),
    ">= 0": (-5e-324, math.inf),
    "0..1": (-5e-324, math.nextafter(1.0, 2.0)),
    "any": (-math.inf, math.inf),
}


class _Core(Protocol[P, R_co]):
    """The core: its own types for floats, Any for arrays."""

    @overload
    def __call__(self, *args: P.args, **kwargs: P.kwargs) -> R_co: ...
    @overload
    def __call__(self, *args: Any, **kwargs: Any) -> Any: ...


class Boundary(Generic[P, R]):
    """A public function: reads any form of input, calls its SI core, gives the result back.

    Parameters
    ----------
    core : callable
        The function of SI floats or arrays.
    returns : str, tuple, mapping or None
        Kind of the result, of each of several results, or None for no quantity.
    overrides : mapping
        Kinds of arguments that differ from the nomenclature; None marks an option.

    Attributes
    ----------
    si : callable
        The core itself.
    kinds : dict
        Argument -> (kind name, domain).
    returns : str, tuple, dict or None
        Kind names of the result.

    Raises
    ------
    TypeError
        If an argument has no kind, or a kind is declared for no argument.
    """

    si: _Core[P, R]
    kinds: dict[str, tuple[str, Domain]]
    returns: Any
    __name__: str
    __qualname__: str
    __wrapped__: Callable[..., Any]

    def __init__(
        self,
        core: Callable[P, R],
        returns: Returns = "ratio",
        overrides: Mapping[str, str | None] | None = None,
    ) -> None:
        functools.update_wrapper(self, core)
        self._core: Callable[..., Any] = core
        self.si = core
        signature = inspect.signature(core)
        declared = _declared(core, signature, dict(overrides or {}))
        self.kinds = {word: (kind.name, domain) for word, (kind, domain) in declared.items()}
        self._declared = declared
        self._parameters = tuple(signature.parameters)
        self._positional = tuple(
            word
            for word, parameter in signature.parameters.items()
            if parameter.kind is not parameter.KEYWORD_ONLY
        )
        self._optional = frozenset(
            word
            for word, parameter in signature.parameters.items()
            if parameter.default is None
        )
        self._signature = signature
        self._bounds = tuple(
            _BOUNDS[declared[word][1]] if word in declared else (math.nan, math.nan)
            for word in self._positional
        )
        self._results, self.returns = _results(core, returns)
        self._single = isinstance(self._results, Kind)

    @overload
    def __call__(self, *args: P.args, **kwargs: P.kwargs) -> R: ...
    @overload
    def __call__(self, *args: Any, **kwargs: Any) -> Any: ...
    def __call__(self, *args: Any, **kwargs: Any) -> Any:
        # Bare floats by position, the common case of tools, need no more than comparisons.
        if not kwargs and self._single and len(args) <= len(self._bounds):
            for value, (low, high) in zip(args, self._bounds, strict=False):
                if type(value) is not float or not low < value < high:
                    break
            else:
                try:
                    result = self._core(*args)
                except (ArithmeticError, ValueError, TypeError):
                    pass  # the long way says what was wrong
                else:
                    if type(result) is float and -math.inf < result < math.inf:
                        return result
        return self._long(args, kwargs)

    def _long(self, args: tuple[Any, ...], kwargs: dict[str, Any]) -> Any:
        given = dict(zip(self._positional, args, strict=False))
        if len(args) > len(self._positional) or not given.keys().isdisjoint(kwargs):
            self._signature.bind(*args, **kwargs)  # raises Python's own TypeError
        given.update(kwargs)
        asked: Asked | None = None
        series = None
        shapes: dict[str, tuple[int, ...]] = {}
        finite = True
        for word, value in given.items():
            if word not in self._declared or (value is None and word in self._optional):
                continue
            kind, domain = self._declared[word]
            si, its = read(value, kind, word, domain=domain)
            if its is not None and (asked is None or asked.registry is None):
                asked = its
            if type(si) is float:
                finite = finite and math.isfinite(si)
            else:
                if not isinstance(si, np.ndarray):
                    series = self._same_index(series, word, si)
                    si = si.to_numpy()
                shapes[word] = si.shape
            given[word] = si
        shape = self._shape(shapes, series) if shapes else None
        result = self._run(given, shape is not None)
        return self._deliver(result, given, shape, series, asked, finite)

    def _same_index(self, series: Any, word: str, value: Any) -> Any:
        if series is not None and not series.index.equals(value.index):
            raise BadInput(
                f"{self.__name__}: the index of {word} differs from that of the Series before it",
                hint="Align them first, or pass numpy arrays",
            )
        return value if series is None else series

    def _shape(self, shapes: dict[str, tuple[int, ...]], series: Any) -> tuple[int, ...]:
        try:
            shape = np.broadcast_shapes(*shapes.values())
        except ValueError:
            shape = (-1,)
        if shape == (-1,) or (series is not None and shape != series.shape):
            listed = ", ".join(f"{word} {form}" for word, form in shapes.items())
            raise BadInput(
                f"{self.__name__}: the shapes do not broadcast: {listed}",
                allowed="equal shapes, or lengths of 1 by numpy's rules",
                hint="For every combination insert an axis, such as velocity[:, None]",
            )
        return shape

    def _run(self, given: dict[str, Any], arrays: bool) -> Any:
        try:
            if arrays:
                with np.errstate(all="ignore"):
                    return self._core(**given)
            return self._core(**given)
        except DropkitError:
            raise
        except ArithmeticError:
            return None if self.returns is None else _Failed
        except ValueError as error:
            if "math domain" in str(error) or "nonnegative" in str(error):
                return None if self.returns is None else _Failed
            raise
        except TypeError:
            self._signature.bind(**given)  # a missing or unknown argument, in Python's words
            raise

    def _deliver(
        self,
        result: Any,
        given: dict[str, Any],
        shape: tuple[int, ...] | None,
        series: Any,
        asked: Asked | None,
        finite: bool,
    ) -> Any:
        kinds = self._results
        if kinds is None:
            return result
        bad = 0

        def one(value: Any, kind: Kind | None) -> Any:
            nonlocal bad
            if kind is None:
                return value
            si, wrong = self._settle(value, given, shape, finite)
            bad += wrong
            if series is not None:
                si = type(series)(si, index=series.index)
            return give(si, kind, asked)

        if isinstance(kinds, tuple):
            values = [result] * len(kinds) if result is _Failed else result
            parts = [one(value, kind) for value, kind in zip(values, kinds, strict=True)]
            make = getattr(type(result), "_make", tuple)
            ready: Any = make(parts)
        elif isinstance(kinds, dict):
            found = dict.fromkeys(kinds, result) if result is _Failed else result
            ready = {key: one(value, kinds.get(key)) for key, value in found.items()}
        else:
            ready = one(result, kinds)
        if bad:
            warnings.warn(
                f"{self.__name__}: {bad} result(s) could not be computed as a finite number "
                "and became NaN",
                DropkitWarning,
                stacklevel=4,
            )
        return ready

    def _settle(
        self,
        value: Any,
        given: dict[str, Any],
        shape: tuple[int, ...] | None,
        finite: bool,
    ) -> tuple[Any, int]:
        """A float or full-shaped float64 array, non-finite elements as NaN, and their count."""
        if shape is None:
            if value is _Failed or isinstance(value, complex):
                return math.nan, int(finite)
            number = float(value)
            if math.isfinite(number):
                return number, 0
            return math.nan, int(finite)
        if value is _Failed or np.iscomplexobj(value):
            value = np.full(shape, np.nan)
        array = np.asarray(value, dtype=np.float64)
        if array.shape != shape:
            array = np.broadcast_to(array, shape).copy()
        elif any(array is one for one in given.values()):
            array = array.copy()
        good = np.isfinite(array)
        if good.all():
            return array, 0
        inputs = np.ones((), dtype=bool)
        for word in self._declared:
            if isinstance(given.get(word), (float, np.ndarray)):
                inputs = inputs & np.isfinite(given[word])
        return np.where(good, array, np.nan), int(np.count_nonzero(~good & inputs))

    def __reduce__(self) -> str:
        return self.__qualname__

    def __repr__(self) -> str:
        return f"<dropkit function {self.__module__}.{self.__qualname__}{self._signature}>"


class _FailedType:
    """Stands for a result that arithmetic could not give."""


_Failed: Final = _FailedType()


def _declared(
    core: Callable[..., Any], signature: inspect.Signature, overrides: dict[str, str | None]
) -> dict[str, tuple[Kind, Domain]]:
    """Kind and domain of each physical argument; TypeError where one is missing."""
    declared: dict[str, tuple[Kind, Domain]] = {}
    for word, parameter in signature.parameters.items():
        if parameter.kind in (parameter.VAR_POSITIONAL, parameter.VAR_KEYWORD):
            raise TypeError(f"{core.__qualname__}: *{word} cannot have a kind")
        text = overrides.pop(word, NOMENCLATURE.get(word, ""))
        if text is None:
            continue
        if not text:
            # Only keyword arguments that are no numbers may go without: they are options.
            if parameter.kind is parameter.KEYWORD_ONLY and "float" not in str(
                parameter.annotation
            ):
                continue
            raise TypeError(
                f"{core.__qualname__}: argument {word!r} has no kind; use a word of the "
                f'nomenclature, or declare it: @physical(..., {word}="length > 0")'
            )
        try:
            declared[word] = kind_of(text)
        except BadInput as error:
            raise TypeError(f"{core.__qualname__}: {word}: {error}") from None
    if overrides:
        raise TypeError(f"{core.__qualname__}: no argument is called {', '.join(overrides)}")
    return declared


def _results(core: Callable[..., Any], returns: Returns) -> tuple[Any, Any]:
    """Kinds of the results and their names in the same form."""
    try:
        if returns is None:
            return None, None
        if isinstance(returns, str):
            kind = kind_of(returns)[0]
            return kind, kind.name
        if isinstance(returns, tuple):
            kinds = tuple(kind_of(text)[0] for text in returns)
            return kinds, tuple(kind.name for kind in kinds)
        by_key = {key: kind_of(text)[0] for key, text in returns.items()}
        return by_key, {key: kind.name for key, kind in by_key.items()}
    except BadInput as error:
        raise TypeError(f"{core.__qualname__}: returns: {error}") from None


def physical(
    returns: Returns = "ratio", **overrides: str | None
) -> Callable[[Callable[P, R]], Boundary[P, R]]:
    """Make an SI function public: any form of input in, and units back if units came in.

    Parameters
    ----------
    returns : str, tuple of str, mapping or None
        Kind of the result; one per element for several results; None for no quantity.
    **overrides : str or None
        Kind and domain of arguments that the nomenclature lacks or gives otherwise, such as
        ``velocity="velocity > 0"``; None for an option that passes through untouched.

    Returns
    -------
    callable
        The decorator; it makes a `Boundary`.

    Raises
    ------
    TypeError
        At once, if an argument has no kind.

    Examples
    --------
    >>> @physical(returns="time")
    ... def travel_time(length: float, velocity: float) -> float:
    ...     return length / velocity
    >>> travel_time(0.5, 10.0)
    0.05
    >>> print(travel_time("500 um", 10.0))
    50.0 microsecond
    """

    def wrap(core: Callable[P, R]) -> Boundary[P, R]:
        return Boundary(core, returns, overrides)

    return wrap
