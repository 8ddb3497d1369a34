"""`physical`: an SI core becomes a function that takes any form of input.

The core is plain arithmetic on SI floats or arrays. The `Boundary` around it reads the
input, checks dimensions and domains, and gives the result back in a unit if any argument
had one. The core stays reachable as ``.si``.
"""

from __future__ import annotations

import functools
import inspect
import math
from collections.abc import Callable, Mapping
from typing import Any, Final, Generic, ParamSpec, Protocol, TypeAlias, TypeVar, overload

import numpy as np

from dropkit.errors import BadInput, DropkitError, DropkitWarning, warn_user
from dropkit.unit_table import NOMENCLATURE, Kind, kind_of
from dropkit.units import Asked, give, read
from dropkit.validity import Domain

__all__ = ["Boundary", "physical"]

P = ParamSpec("P")
R = TypeVar("R")
R_co = TypeVar("R_co", covariant=True)

Returns: TypeAlias = str | tuple[str, ...] | Mapping[str, str] | None

# What a float must satisfy to skip the long way; NaN and the ends of a domain do not.
_QUICK: Final[dict[str, str]] = {
    "> 0": "0.0 < {0} < inf",
    ">= 0": "0.0 <= {0} < inf",
    "0..1": "0.0 <= {0} <= 1.0",
    "any": "-inf < {0} < inf",
}
_FAILED: Final = object()  # a result that arithmetic could not give


class Core(Protocol[P, R_co]):
    """An SI core: its own result for floats, Any for arrays."""

    @overload
    def __call__(self, *args: P.args, **kwargs: P.kwargs) -> R_co: ...
    @overload
    def __call__(self, *args: Any, **kwargs: Any) -> Any: ...


class Boundary(Generic[P, R]):
    """A public function: reads any form of input, runs its SI core, gives the result back.

    Made by `physical`. It keeps the core's name, help and signature and pickles by reference.

    Parameters
    ----------
    core : callable
        The function of SI floats or arrays.
    returns : str, tuple, mapping or None
        Kind of the result, of each of several results, or None for no quantity.
    overrides : mapping, optional
        Kinds of arguments that differ from the nomenclature; None marks an option.

    Attributes
    ----------
    si : callable
        The core: bare arithmetic, unchecked.
    kinds, domains : dict of str
        Name of the kind and domain of each physical argument.
    returns : str, tuple, dict or None
        Name of the kind of the result.

    Raises
    ------
    TypeError
        If an argument has no kind, or a kind is declared for no argument.
    """

    si: Core[P, R]
    kinds: dict[str, str]
    domains: dict[str, Domain]
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
        signature = inspect.signature(core)
        declared = _declared(core, signature, dict(overrides or {}))
        self.si = core
        self.kinds = {word: kind.name for word, (kind, _) in declared.items()}
        self.domains = {word: domain for word, (_, domain) in declared.items()}
        self._results, self.returns = _results(core, returns)
        self._reads = tuple(
            (word, kind, domain, signature.parameters[word].default is None)
            for word, (kind, domain) in declared.items()
        )
        self._core: Callable[..., Any] = core
        self._signature = signature
        self._quick = _quick(self, core, signature, isinstance(self._results, Kind))

    @overload
    def __call__(self, *args: P.args, **kwargs: P.kwargs) -> R: ...
    @overload
    def __call__(self, *args: Any, **kwargs: Any) -> Any: ...
    def __call__(self, *args: Any, **kwargs: Any) -> Any:
        """The result for any form of input."""
        return self._quick(*args, **kwargs)

    def __reduce__(self) -> str:
        return self.__qualname__

    def __repr__(self) -> str:
        # Short, because `help` cuts it; the types stand in the signature.
        return f"{self.__name__}({', '.join(self._signature.parameters)})"

    def _long(self, given: dict[str, Any]) -> Any:
        """The call with everything that may come in; `given` holds every argument."""
        asked: Asked | None = None
        series = None
        shapes: dict[str, tuple[int, ...]] = {}
        finite = True
        for word, kind, domain, optional in self._reads:
            value = given[word]
            if value is None and optional:
                continue
            si, its = read(value, kind, word, domain=domain)
            if its is not None and (asked is None or asked.registry is None):
                asked = its
            if type(si) is float:
                finite = finite and math.isfinite(si)
            else:
                if not isinstance(si, np.ndarray):
                    if series is not None and not series.index.equals(si.index):
                        raise self._error(
                            f"the index of {word} differs from that of the Series before it",
                            hint="Align them first, or pass numpy arrays",
                        )
                    series = si
                    si = si.to_numpy()
                shapes[word] = si.shape
            given[word] = si
        shape = self._shape(shapes, series) if shapes else None
        result = self._run(given, shape is not None)
        if self._results is None:
            return result
        deliver = _Delivery(self._reads, given, shape, series, asked, finite)
        ready = deliver.all(result, self._results)
        if deliver.bad:
            warn_user(
                f"{self.__name__}: {deliver.bad} result(s) had no finite value and became NaN",
                DropkitWarning,
            )
        return ready

    def _error(self, what: str, *, allowed: str = "", hint: str = "") -> BadInput:
        return BadInput(f"{self.__name__}: {what}", allowed=allowed, hint=hint)

    def _shape(self, shapes: dict[str, tuple[int, ...]], series: Any) -> tuple[int, ...]:
        """The common shape by numpy's rules; a Series fixes it."""
        try:
            shape = np.broadcast_shapes(*shapes.values())
        except ValueError:
            shape = None
        if shape is None or (series is not None and shape != series.shape):
            listed = ", ".join(f"{word} {form}" for word, form in shapes.items())
            raise self._error(
                f"the shapes do not broadcast: {listed}",
                allowed="equal shapes, or lengths of 1 by numpy's rules",
                hint="For every combination add an axis, such as velocity[:, None]",
            )
        return shape

    def _run(self, given: dict[str, Any], arrays: bool) -> Any:
        """The core's result; _FAILED where arithmetic gives none."""
        try:
            if not arrays:
                return self._core(**given)
            with np.errstate(all="ignore"):
                return self._core(**given)
        except DropkitError:
            raise
        except ArithmeticError:
            return _FAILED
        except ValueError as error:
            # What `math` says outside the domain of a function, in 3.11 and in 3.14.
            if "math domain" in str(error) or "expected a" in str(error):
                return _FAILED
            raise


class _Delivery:
    """Brings the results of one call into the form that was asked for; counts what failed."""

    def __init__(
        self,
        reads: tuple[tuple[str, Kind, Domain, bool], ...],
        given: dict[str, Any],
        shape: tuple[int, ...] | None,
        series: Any,
        asked: Asked | None,
        finite: bool,
    ) -> None:
        self.reads, self.given, self.shape = reads, given, shape
        self.series, self.asked, self.finite = series, asked, finite
        # Under outside="nan" a NaN is the answer that was asked for, not a failure.
        self.nan_asked = given.get("outside") == "nan"
        self.bad = 0

    def all(self, result: Any, kinds: Any) -> Any:
        """One result, or a tuple or dict of several, each by its kind."""
        if isinstance(kinds, Kind):
            return self.one(result, kinds)
        if isinstance(kinds, tuple):
            values = (_FAILED,) * len(kinds) if result is _FAILED else result
            parts = [self.one(value, kind) for value, kind in zip(values, kinds, strict=True)]
            make: Callable[[list[Any]], Any] = getattr(type(result), "_make", tuple)
            return make(parts)
        values = dict.fromkeys(kinds, _FAILED) if result is _FAILED else result
        return {key: self.one(value, kinds[key]) for key, value in values.items()}

    def one(self, value: Any, kind: Kind) -> Any:
        """One result; non-finite elements become NaN."""
        if self.shape is None:
            return give(self.scalar(value), kind, self.asked)
        array = self.array(value, self.shape)
        if self.series is not None:
            return type(self.series)(array, index=self.series.index)
        return give(array, kind, self.asked)

    def scalar(self, value: Any) -> float:
        # A negative number to a broken power is complex in Python: no result here.
        if value is not _FAILED and not isinstance(value, complex):
            number = float(value)
            if math.isfinite(number) or (self.nan_asked and math.isnan(number)):
                return number
        self.bad += self.finite
        return math.nan

    def array(self, value: Any, shape: tuple[int, ...]) -> Any:
        if value is _FAILED or np.iscomplexobj(value):
            value = np.inf  # becomes NaN below, and counts
        result = np.asarray(value, dtype=np.float64)
        if result.shape != shape:
            result = np.broadcast_to(result, shape).copy()
        elif any(result is one for one in self.given.values()):
            result = result.copy()  # a result never shares memory with an input
        good = np.isfinite(result)
        if good.all():
            return result
        known = ~np.isnan(result) if self.nan_asked else np.ones(shape, dtype=bool)
        for word, _, _, _ in self.reads:
            if isinstance(self.given[word], (float, np.ndarray)):
                known &= np.isfinite(self.given[word])
        self.bad += int(np.count_nonzero(~good & known))
        return np.where(good, result, np.nan)


def _quick(
    boundary: Boundary[..., Any],
    core: Callable[..., Any],
    signature: inspect.Signature,
    single: bool,
) -> Callable[..., Any]:
    """The front door: binds arguments as Python does and lets plain floats straight through.

    Written out per function, as `dataclasses` does it, because a loop over arguments
    costs more than most cores.
    """
    head, call, tests = [], [], []
    space: dict[str, Any] = {
        "__name__": __name__,  # so that a warning knows the frame for one of ours
        "_core": core,
        "_long": boundary._long,
        "inf": math.inf,
    }
    starred = False
    for word, parameter in signature.parameters.items():
        text = word
        if parameter.kind is parameter.KEYWORD_ONLY and not starred:
            head.append("*")
            starred = True
        if parameter.default is not parameter.empty:
            space[f"_default_{word}"] = parameter.default
            text = f"{word}=_default_{word}"
        head.append(text)
        call.append(f"{word}={word}" if starred else word)
        if word in boundary.domains:
            test = f"type({word}) is float and {_QUICK[boundary.domains[word]].format(word)}"
            none = f"{word} is None or " if parameter.default is None else ""
            tests.append(f"({none}{test})")
    given = ", ".join(f"{word!r}: {word}" for word in signature.parameters)
    lines = [f"def {core.__name__}({', '.join(head)}):"]
    if single:
        lines += [
            f"    if {' and '.join(tests) or 'True'}:",
            "        try:",
            f"            _result = _core({', '.join(call)})",
            "        except (ArithmeticError, ValueError):",
            "            pass",
            "        else:",
            "            if type(_result) is float and -inf < _result < inf:",
            "                return _result",
        ]
    lines.append(f"    return _long({{{given}}})")
    exec(compile("\n".join(lines), f"<boundary of {core.__qualname__}>", "exec"), space)
    found: Callable[..., Any] = space[core.__name__]
    return found


def _declared(
    core: Callable[..., Any], signature: inspect.Signature, overrides: dict[str, str | None]
) -> dict[str, tuple[Kind, Domain]]:
    """Kind and domain of each physical argument; TypeError where one is missing."""
    declared: dict[str, tuple[Kind, Domain]] = {}
    for word, parameter in signature.parameters.items():
        if parameter.kind not in (parameter.POSITIONAL_OR_KEYWORD, parameter.KEYWORD_ONLY):
            raise TypeError(f"{core.__qualname__}: {parameter} cannot be called by name")
        text = overrides.pop(word, NOMENCLATURE.get(word, ""))
        if text is None:
            continue
        if not text:
            # Only keyword arguments that are no numbers may go without: they are options.
            number = "float" in str(parameter.annotation)
            if parameter.kind is parameter.KEYWORD_ONLY and not number:
                continue
            raise TypeError(
                f"{core.__qualname__}: the argument {word!r} has no kind; use a word of the "
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
    """Kinds of the results, and their names, in the form of `returns`."""
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

    Notes
    -----
    Default values of the core are SI. Keyword-only arguments that are no numbers are options
    and pass through untouched. A result that is not finite although every input was, and
    every arithmetic error, becomes NaN with one warning. Results beside a Series are Series.

    Examples
    --------
    >>> @physical(returns="time")
    ... def travel_time(length: float, velocity: float) -> float:
    ...     return length / velocity
    >>> travel_time(0.5, 10.0)
    0.05
    >>> print(travel_time("500 um", 10.0))
    50.0 microsecond
    >>> travel_time.si(0.5, 10.0)
    0.05
    """

    def wrap(core: Callable[P, R]) -> Boundary[P, R]:
        return Boundary(core, returns, overrides)

    return wrap
