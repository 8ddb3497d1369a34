"""What an equation form is: its parameters, a scalar body, an array body, and how to run them."""

from __future__ import annotations

import math
from collections.abc import Callable, Mapping
from dataclasses import dataclass, field
from typing import Any, Final, NamedTuple, TypeAlias

import numpy as np

from dropkit.errors import RecordError, nearest

__all__ = ["ArrayBody", "Form", "Parameter", "ScalarBody", "evaluate", "scale_by"]

FloatArray: TypeAlias = "np.ndarray[Any, np.dtype[np.float64]]"
ScalarBody: TypeAlias = Callable[[float], float]
ArrayBody: TypeAlias = Callable[[FloatArray, FloatArray], None]

# Small enough for input, output and one or two buffers to stay in a core's own cache.
CHUNK: Final = 16384


class Parameter(NamedTuple):
    """One parameter that an equation form takes from a record.

    Parameters
    ----------
    name : str
        The key in the record.
    kind : str
        ``"number"``, ``"positive"`` (a number above zero), ``"numbers"`` (a list) or ``"word"``.
    default : object
        Value where the record has none; ``None`` makes the parameter required.
    size : tuple of int
        Fewest and most numbers of a list.
    words : tuple of str
        The words that are allowed.
    """

    name: str
    kind: str = "number"
    default: Any = None
    size: tuple[int, int] = (1, 64)
    words: tuple[str, ...] = ()

    def read(self, value: Any) -> Any:
        """The value as float, tuple of floats or word; ValueError says what is wrong."""
        if self.kind == "word":
            if value not in self.words:
                raise ValueError(f"must be {' or '.join(map(repr, self.words))}, not {value!r}")
            return value
        if self.kind == "numbers":
            if not isinstance(value, (list, tuple)):
                raise ValueError(f"must be a list of numbers, not {value!r}")
            low, high = self.size
            if not low <= len(value) <= high:
                wanted = f"{low}" if low == high else f"{low} to {high}"
                raise ValueError(f"must hold {wanted} numbers, not {len(value)}")
            return tuple(map(_number, value))
        number = _number(value)
        if self.kind == "positive" and number <= 0:
            raise ValueError(f"must be above zero, not {number:g}")
        return number


def _number(value: Any) -> float:
    if isinstance(value, bool) or not isinstance(value, (int, float)):
        raise ValueError(f"must be a number, not {value!r}")
    if not math.isfinite(value):
        raise ValueError(f"must be finite, not {value!r}")
    return float(value)


# Coefficients are stored as printed; this turns what they give into SI.
UNIT: Final = Parameter("unit", "positive", 1.0)


@dataclass(frozen=True, slots=True)
class Form:
    """An equation of temperature: a fast scalar body and an in-place array body.

    Parameters
    ----------
    name : str
        The word that a record's ``form`` holds.
    equation : str
        The equation in one line.
    parameters : tuple of Parameter
        What a record must or may give; ``unit`` is allowed in every form.
    make : callable
        Takes the parameters by name, gives the two bodies.

    Notes
    -----
    Both bodies take the temperature in K and give SI. Where an equation has no value (below a
    pole, above the critical point) the scalar body raises ArithmeticError or ValueError
    and the array body gives NaN or infinity with numpy's own warning: whoever calls them
    outside a record's range catches the one and silences the other. Neither keeps a buffer,
    so both can be used from many threads.
    """

    name: str
    equation: str
    parameters: tuple[Parameter, ...]
    make: Callable[..., tuple[ScalarBody, ArrayBody]] = field(repr=False)

    def read(self, parameters: Mapping[str, Any], *, label: str = "") -> dict[str, Any]:
        """The parameters of a record as floats and tuples, defaults filled in.

        Parameters
        ----------
        parameters : mapping
            A record's parameters.
        label : str, optional
            The record's label, for the error.

        Returns
        -------
        dict
            One entry per parameter of the form.

        Raises
        ------
        RecordError
            For a parameter that is missing, unknown or of the wrong kind.
        """
        where = f"{label}: " if label else ""
        known = {parameter.name: parameter for parameter in (*self.parameters, UNIT)}
        for name in parameters:
            if name not in known:
                raise RecordError(
                    f"{where}form '{self.name}' takes no parameter '{name}'",
                    allowed=f"{', '.join(known)} for {self.equation}",
                    choices=nearest(name, known, 1),
                )
        values = {}
        for name, parameter in known.items():
            value = parameters.get(name, parameter.default)
            if value is None:
                raise RecordError(
                    f"{where}form '{self.name}' needs the parameter '{name}'",
                    allowed=f"{', '.join(known)} for {self.equation}",
                )
            try:
                values[name] = parameter.read(value)
            except ValueError as error:
                raise RecordError(
                    f"{where}parameter '{name}' of form '{self.name}' {error}",
                    allowed=self.equation,
                ) from None
        return values

    def scalar(self, parameters: Mapping[str, Any], *, label: str = "") -> ScalarBody:
        """The equation as a function of one float, coefficients bound.

        Parameters
        ----------
        parameters : mapping
            A record's parameters.
        label : str, optional
            The record's label, for the error.

        Returns
        -------
        callable
            Temperature [K] to value [SI].

        Raises
        ------
        RecordError
            For a parameter that is missing, unknown or of the wrong kind.

        Examples
        --------
        >>> from dropkit.properties.equations import FORMS
        >>> density = FORMS["polynomial"].scalar({"coefficients": [1000.0, -0.5], "centre": 300})
        >>> density(310.0)
        995.0
        """
        return self._bodies(parameters, label)[0]

    def array(self, parameters: Mapping[str, Any], *, label: str = "") -> ArrayBody:
        """The equation as a function of an array that writes into a second array.

        Parameters
        ----------
        parameters : mapping
            A record's parameters.
        label : str, optional
            The record's label, for the error.

        Returns
        -------
        callable
            Takes temperatures [K] and an array for the values [SI] that must not overlap;
            best run through `evaluate`.

        Raises
        ------
        RecordError
            For a parameter that is missing, unknown or of the wrong kind.
        """
        return self._bodies(parameters, label)[1]

    def _bodies(self, parameters: Mapping[str, Any], label: str) -> tuple[ScalarBody, ArrayBody]:
        values = self.read(parameters, label=label)
        try:
            return self.make(**values)
        except ValueError as error:
            where = f"{label}: " if label else ""
            raise RecordError(f"{where}form '{self.name}' {error}", allowed=self.equation) from None


def scale_by(out: FloatArray, factor: float) -> None:
    """Multiply in place, at no cost where the factor is one."""
    if factor != 1.0:
        np.multiply(out, factor, out=out)


def evaluate(
    body: ArrayBody, x: FloatArray, out: FloatArray | None = None, chunk: int = CHUNK
) -> FloatArray:
    """Run an array body over an array of any shape, chunk by chunk.

    Parameters
    ----------
    body : callable
        An array body, such as ``FORMS["vogel"].array(parameters)``.
    x : ndarray of float64
        Argument, usually temperature [K].
    out : ndarray of float64, optional
        Where the values go, of the shape of `x`; it may be `x` itself.
    chunk : int
        Elements per chunk; keeps the buffers in the processor's cache.

    Returns
    -------
    ndarray of float64
        The values, of the shape of `x`: `out` where it was given.

    Raises
    ------
    ValueError
        If `out` has another shape than `x`.

    Examples
    --------
    >>> import numpy as np
    >>> from dropkit.properties.equations import FORMS, evaluate
    >>> body = FORMS["polynomial"].array({"coefficients": [1000.0, -0.5], "centre": 300})
    >>> evaluate(body, np.array([300.0, 310.0]))
    array([1000.,  995.])
    """
    if out is None:
        out = np.empty(x.shape)
    elif out.shape != x.shape:
        raise ValueError(f"out has shape {out.shape}, the argument {x.shape}")
    if not out.flags.c_contiguous or np.may_share_memory(x, out):
        out[...] = evaluate(body, x, None, chunk)
        return out
    flat_x, flat_out = x.reshape(-1), out.reshape(-1)
    for start in range(0, flat_x.size, chunk):
        stop = start + chunk
        body(flat_x[start:stop], flat_out[start:stop])
    return out
