"""What an adapter hands over: one property of one chemical over temperature, and whence it comes."""

from __future__ import annotations

import math
import re
from collections.abc import Callable
from dataclasses import dataclass, field
from typing import Any, Final, TypeAlias

import numpy as np

from dropkit.errors import BadInput, EngineError, OutOfRange
from dropkit.properties.curves import Fast, FloatArray
from dropkit.provenance import Grade, RecordUse
from dropkit.validity import Range

__all__ = ["TOP_OF_RANGE", "EngineCurve", "check_cas", "inside_liquid"]

# Ranges end at this part of the critical temperature: closer to it surface tension and heat of
# vaporisation vanish, and no equation of a handbook is meant to hold.
TOP_OF_RANGE: Final = 0.98

_CAS: Final = re.compile(r"([1-9][0-9]{1,6})-([0-9]{2})-([0-9])")
_Bodies: TypeAlias = tuple[Callable[[float], float], Callable[[FloatArray, FloatArray], None]]


def check_cas(cas: object) -> str:
    """The CAS registry number itself, if it is one.

    Parameters
    ----------
    cas : object
        What was given.

    Returns
    -------
    str
        `cas`, unchanged.

    Raises
    ------
    BadInput
        For anything else than a CAS number: a name, a number with a wrong check digit.

    Notes
    -----
    The last digit is the sum of the others, each times its place counted from the right,
    modulo 10.

    Examples
    --------
    >>> check_cas("110-82-7")
    '110-82-7'
    """
    found = _CAS.fullmatch(cas) if isinstance(cas, str) else None
    if found is None:
        raise BadInput(
            f"{cas!r} is no CAS number: engines are asked by CAS number only",
            allowed="a text such as '110-82-7'",
            hint="A name can slip to another chemical inside an engine; dropkit.liquid() reads "
            "names, from dropkit's own records",
        )
    digits = found[1] + found[2]
    check = sum(place * int(digit) for place, digit in enumerate(reversed(digits), 1)) % 10
    if check != int(found[3]):
        raise BadInput(
            f"{cas!r} is no CAS number: its last digit does not check",
            allowed=f"{found[1]}-{found[2]}-{check} if the other digits are right",
        )
    return found[0]


def inside_liquid(low: float, high: float, critical_temperature: float | None) -> Range | None:
    """A method's stated limits, cut below the critical point; None where nothing is left.

    Examples
    --------
    >>> print(inside_liquid(279.69, 553.8, 553.8))
    279.69 to 542.724 K (6.54 to 269.574 degC)
    """
    if critical_temperature is not None:
        high = min(high, TOP_OF_RANGE * critical_temperature)
    return Range(low, high) if 0.0 < low < high else None


@dataclass(frozen=True, slots=True)
class EngineCurve:
    """One property of a saturated liquid over temperature, as one method of an engine gives it.

    Made by `dropkit.properties.engines.engine_curve`; see there for an example.

    Parameters
    ----------
    cas : str
        CAS registry number.
    name : str
        What the engine calls the chemical; for display only.
    quantity : str
        The word of the interface, such as ``"viscosity"``.
    engine : str
        ``"CoolProp"`` or ``"thermo"``.
    version : str
        Version of the engine, and of the package that holds its data where that is another.
    method : str
        The engine's name for the method, such as ``"DIPPR_PERRY_8E"``.
    form : str
        The kind of equation.
    place : str
        Table or equation that the method rests on.
    range : Range
        Stated temperature range [K]; nothing is given outside.
    uncertainty : float
        Relative standard uncertainty (k = 1), from the comparison with published values.
    grade : Grade
        ``"single"`` for a fit to data, ``"estimated"`` for a prediction; never better.
    sources : tuple of str
        Keys of the sources.
    cautions : tuple of str
        What a user should know.
    bodies : tuple of callable
        The equation for a float, and for an array into another; not shown, not compared.

    Notes
    -----
    Offers what `dropkit.properties.curves.Curve` offers: ``range``, ``scalar``, ``fill``, ``fast``.
    """

    cas: str
    name: str
    quantity: str
    engine: str
    version: str
    method: str
    form: str
    place: str
    range: Range
    uncertainty: float
    grade: Grade
    sources: tuple[str, ...]
    cautions: tuple[str, ...]
    bodies: _Bodies = field(repr=False, compare=False)

    def __reduce__(self) -> tuple[Any, ...]:
        # The bodies hold closures; the engine is asked again where the pickle is read.
        return (_again, (self.cas, self.quantity, self.method))

    @property
    def fast(self) -> Fast:
        """Ends of the range and the bare scalar evaluator, to be used between these ends only."""
        return Fast(self.range.low, self.range.high, self.bodies[0])

    @property
    def label(self) -> str:
        """Where the value comes from, such as ``"thermo: DIPPR_PERRY_8E of 110-82-7"``."""
        return f"{self.engine}: {self.method} of {self.cas}"

    def scalar(self, temperature: float) -> float:
        """The property at one temperature.

        Parameters
        ----------
        temperature : float
            Temperature [K].

        Returns
        -------
        float
            The value [SI]; NaN for NaN.

        Raises
        ------
        OutOfRange
            Outside the stated range: the engines' own extrapolation is never passed on.
        EngineError
            If the engine fails inside its range.
        """
        if temperature != temperature:
            return math.nan
        if not self.range.low <= temperature <= self.range.high:
            raise OutOfRange(
                f"{self.quantity} of {self.cas}: {temperature:g} K is outside what "
                f"{self.engine}'s {self.method} is stated for",
                allowed=str(self.range),
                hint="Engines are not extrapolated",
            )
        try:
            value = self.bodies[0](float(temperature))
        except (ArithmeticError, ValueError) as error:
            raise EngineError(
                f"{self.label}: no {self.quantity} at {temperature:g} K ({error})"
            ) from None
        if not 0.0 < value < math.inf:
            raise EngineError(
                f"{self.label}: {self.quantity} at {temperature:g} K came out {value:g}"
            )
        return value

    def fill(self, temperature: FloatArray, out: FloatArray) -> None:
        """Write the property at many temperatures into another array.

        Parameters
        ----------
        temperature : ndarray of float64
            Temperatures [K], flat.
        out : ndarray of float64
            Where the values [SI] go, of the same length. NaN outside the stated range, for NaN,
            and where the engine fails: never infinity.
        """
        good = (temperature >= self.range.low) & (temperature <= self.range.high)
        every = bool(good.all())
        with np.errstate(all="ignore"):
            if every:
                self.bodies[1](temperature, out)
            else:
                part = np.ascontiguousarray(temperature[good])
                values = np.empty_like(part)
                if part.size:
                    self.bodies[1](part, values)
                out[...] = math.nan
                out[good] = values
            out[~((out > 0.0) & (out < math.inf))] = math.nan

    def record_use(self) -> RecordUse:
        """This method as it stands in a trail."""
        return RecordUse(
            record=self.label,
            property=self.quantity,
            form=self.form,
            grade=self.grade,
            sources=self.sources,
            place=self.place,
            obtained=f"as {self.engine} {self.version} gives it",
            range=str(self.range),
            uncertainty=self.uncertainty,
        )


def _again(cas: str, prop: str, method: str) -> EngineCurve:
    from dropkit.properties.engines import engine_curves

    for curve in engine_curves(cas, prop):
        if curve.method == method:
            return curve
    raise EngineError(
        f"{method} no longer gives the {prop} of {cas}: the engines here are of another version"
    )
