"""Which method of which engine serves a property, and what the others say about it."""

from __future__ import annotations

import math
from dataclasses import replace
from itertools import chain
from typing import Final

import numpy as np

from dropkit.errors import BadInput, EngineError, MissingProperty, nearest
from dropkit.properties.engines.coolprop_adapter import (
    COOLPROP_LETTERS,
    COOLPROP_METHOD,
    coolprop_curve,
)
from dropkit.properties.engines.engine_types import EngineCurve, check_cas
from dropkit.properties.engines.known_faults import ANY, LIMITED, WIDER, exclusion_reason
from dropkit.properties.engines.thermo_adapter import METHODS, REFUSED, handbook_curve
from dropkit.properties.property_words import PROPERTIES, property_name
from dropkit.validity import Range

__all__ = [
    "chosen_curve",
    "engine_boiling_point",
    "engine_curve",
    "engine_curves",
    "engine_properties",
]

# A method whose range holds this temperature goes before one whose range doesn't.
_ROOM: Final = 298.15  # K
# Methods are compared here, where dropkit is used, if their ranges reach.
_WINDOW: Final = (263.15, 423.15)  # K
_ATMOSPHERE: Final = 101325.0  # Pa

# Beyond this relative difference of two methods (larger over smaller, less one) neither is believed.
_CONTRADICTION: Final = {
    "density": 0.03,
    "viscosity": 0.3,
    "surface_tension": 0.1,
    "vapour_pressure": 0.6,
    "heat_of_vaporisation": 0.15,
    "heat_capacity": 0.2,
    "thermal_conductivity": 0.2,
}


def engine_curve(cas: str, prop: str, *, method: str | None = None) -> EngineCurve:
    """One property of a saturated liquid over temperature, from an engine.

    Holds for chemicals that CoolProp knows or that stand in the handbook tables of thermo. Takes
    CoolProp's reference equation where there is one, else the handbooks in the order of their
    agreement with published values, else CoolProp's predictions.

    Parameters
    ----------
    cas : str
        CAS registry number; names are refused.
    prop : str
        The word of the interface, such as ``"viscosity"``.
    method : str, optional
        A whitelisted method by its name, such as ``"DIPPR_PERRY_8E"``.

    Returns
    -------
    EngineCurve
        With range, evaluators, uncertainty, grade, cautions and sources. Where other methods
        differ from it by more than the uncertainties allow, a caution says so and the uncertainty
        is widened to half of the difference.

    Raises
    ------
    BadInput
        If `cas` is no CAS number, or `method` no text.
    UnknownName
        If `prop` is no property.
    MissingProperty
        If no whitelisted method has it.
    EngineError
        If those that have it are known to be wrong or contradict each other, or if an engine is
        missing or unreadable.

    Notes
    -----
    Nothing is extrapolated, whatever the engine would do.

    Examples
    --------
    >>> curve = engine_curve("67-66-3", "viscosity")  # chloroform
    >>> curve.method, curve.grade, round(1e3 * curve.scalar(298.15), 2)
    ('DIPPR_PERRY_8E', 'single', 0.54)
    """
    return _with_phase(chosen_curve(cas, prop, method))


def chosen_curve(cas: str, prop: str, method: str | None = None) -> EngineCurve:
    """What `engine_curve` gives, without its caution about the boiling point.

    Parameters
    ----------
    cas, prop, method : str
        As `engine_curve` takes them.
    """
    check_cas(cas)
    property_name(prop)
    if method is not None:
        _check_method(prop, method)
    every = _admissible(cas, prop)
    wanted = [curve for curve in every if method in (None, curve.method)]
    if not wanted:
        raise _nothing(cas, prop, method, every)
    chosen = next((c for c in wanted if c.range.holds(_ROOM)), wanted[0])
    chosen, contradiction = _compared(chosen, every)
    if contradiction:
        raise EngineError(
            f"No trustworthy {prop} of {cas} ({chosen.name}) from an engine: {contradiction}",
            hint="engine_curves() gives both; measured values go in with dropkit.fluid()",
        )
    return chosen


def engine_curves(cas: str, prop: str) -> tuple[EngineCurve, ...]:
    """All whitelisted methods for one property, best first, to see them side by side.

    Parameters
    ----------
    cas : str
        CAS registry number; names are refused.
    prop : str
        The word of the interface, such as ``"viscosity"``.

    Returns
    -------
    tuple of EngineCurve
        Without those that are known to be wrong; with those that contradict each other, each of
        which says so in its cautions. Empty where there is none.

    Raises
    ------
    BadInput
        If `cas` is no CAS number.
    UnknownName
        If `prop` is no property.
    EngineError
        If an engine is missing or unreadable.

    Examples
    --------
    >>> [curve.method for curve in engine_curves("67-66-3", "density")]
    ['VDI_PPDS', 'DIPPR_PERRY_8E']
    """
    check_cas(cas)
    property_name(prop)
    every = _admissible(cas, prop)
    return tuple(_with_phase(_compared(curve, every)[0]) for curve in every)


def engine_properties(cas: str) -> tuple[str, ...]:
    """The properties that `engine_curve` gives for a chemical.

    Parameters
    ----------
    cas : str
        CAS registry number; names are refused.

    Returns
    -------
    tuple of str
        In the order of tables; empty where no engine knows the chemical.

    Raises
    ------
    BadInput
        If `cas` is no CAS number.
    EngineError
        If an engine is missing or unreadable.

    Examples
    --------
    >>> engine_properties("872-50-4")  # N-methyl-2-pyrrolidone: estimates only
    ()
    """
    check_cas(cas)
    held = []
    for prop in PROPERTIES:
        every = _admissible(cas, prop)
        if every:
            chosen = next((c for c in every if c.range.holds(_ROOM)), every[0])
            if not _compared(chosen, every)[1]:
                held.append(prop)
    return tuple(held)


def engine_boiling_point(cas: str) -> float | None:
    """Boiling point at 101325 Pa [K] from an engine's vapour pressure, or None.

    Parameters
    ----------
    cas : str
        CAS registry number; names are refused.

    Returns
    -------
    float or None
        None where no admissible vapour pressure reaches 101325 Pa.

    Raises
    ------
    BadInput
        If `cas` is no CAS number.
    EngineError
        If an engine is missing or unreadable.

    Examples
    --------
    >>> round(engine_boiling_point("110-82-7"), 1)
    353.9
    """
    check_cas(cas)
    for curve in _admissible(cas, "vapour_pressure"):
        low, high = curve.range.low, curve.range.high
        if not curve.scalar(low) <= _ATMOSPHERE <= curve.scalar(high):
            continue
        while high - low > 1e-6:
            middle = 0.5 * (low + high)
            low, high = (middle, high) if curve.scalar(middle) < _ATMOSPHERE else (low, middle)
        return 0.5 * (low + high)
    return None


def _check_method(prop: str, method: str) -> None:
    listed = [m.method for m in METHODS if m.quantity == prop]
    if prop in COOLPROP_LETTERS:
        listed.insert(0, COOLPROP_METHOD)
    if not isinstance(method, str):
        raise BadInput(f"method={method!r} is no name of a method", allowed=", ".join(listed))
    if method in listed:
        return
    why = REFUSED.get(
        method, "it is not among those that dropkit has compared with published values"
    )
    raise EngineError(
        f"The method {method!r} is not used for {prop}: {why}",
        allowed=", ".join(listed),
        choices=[] if method in REFUSED else nearest(method, listed, 1),
    )


def _found(cas: str, prop: str) -> list[EngineCurve]:
    """Every whitelisted method that has the property, known faults included; best first."""
    handbooks = (handbook_curve(cas, method) for method in METHODS if method.quantity == prop)
    found = [curve for curve in chain((coolprop_curve(cas, prop),), handbooks) if curve]
    # Fits to data before predictions.
    return sorted(found, key=lambda curve: curve.grade == "estimated")


def _admissible(cas: str, prop: str) -> list[EngineCurve]:
    """The methods without known faults, cut and widened where that is known to be needed."""
    curves = []
    for found in _found(cas, prop):
        if exclusion_reason(cas, prop, found.method):
            continue
        curve = found
        for limit in LIMITED:
            if (limit.cas, limit.property) == (cas, prop) and (
                limit.methods == ANY or curve.method in limit.methods
            ):
                low, high = max(curve.range.low, limit.low), min(curve.range.high, limit.high)
                curve = replace(
                    curve, range=Range(low, high), cautions=(*curve.cautions, limit.reason)
                )
        for wider in WIDER:
            if (wider.cas, wider.property, wider.method) == (cas, prop, curve.method):
                curve = replace(
                    curve,
                    uncertainty=wider.uncertainty,
                    cautions=(*curve.cautions, wider.reason),
                )
        curves.append(curve)
    return curves


def _compared(curve: EngineCurve, every: list[EngineCurve]) -> tuple[EngineCurve, str]:
    """A curve with what the others say about it, and the contradiction where it is hopeless."""
    uncertainty, cautions, contradiction = curve.uncertainty, list(curve.cautions), ""
    for other in every:
        if other.method == curve.method or other.grade == "estimated":
            continue
        difference, temperature = _difference(curve, other)
        if abs(difference) <= 2.0 * math.hypot(curve.uncertainty, other.uncertainty):
            continue
        text = (
            f"{other.engine}'s {other.method} gives {100.0 * difference:+.0f} % at "
            f"{temperature:.0f} K"
        )
        uncertainty = max(uncertainty, 0.5 * abs(difference))
        apart = math.expm1(abs(math.log1p(difference)))
        if curve.grade != "estimated" and apart > _CONTRADICTION.get(curve.quantity, 0.1):
            contradiction = f"{curve.engine}'s {curve.method} is contradicted: {text}"
        cautions.append(f"methods differ: {text}")
    if tuple(cautions) == curve.cautions:
        return curve, ""
    return replace(curve, uncertainty=uncertainty, cautions=tuple(cautions)), contradiction


def _with_phase(curve: EngineCurve) -> EngineCurve:
    """A curve with the caution that it needs pressure above its boiling point."""
    boiling = engine_boiling_point(curve.cas)
    if boiling is None or curve.range.high <= boiling + 0.1:
        return curve
    caution = (
        f"of the saturated liquid: above {boiling - 273.15:.1f} degC, its boiling point at 1 atm, "
        "it needs pressure to stay liquid"
    )
    return replace(curve, cautions=(*curve.cautions, caution))


def _difference(curve: EngineCurve, other: EngineCurve) -> tuple[float, float]:
    """The largest relative difference of another curve where both hold, and its temperature."""
    low = max(curve.range.low, other.range.low)
    # Clear of the critical point, where values vanish and percentages mean little.
    high = 0.9 * min(curve.range.high, other.range.high)
    if max(low, _WINDOW[0]) < min(high, _WINDOW[1]):
        low, high = max(low, _WINDOW[0]), min(high, _WINDOW[1])
    else:  # a gas at room temperature: not down at its melting point either
        low = 0.5 * (low + high)
    if not low < high:
        return 0.0, low
    temperature = np.linspace(low, high, 5)
    own, others = np.empty(5), np.empty(5)
    curve.fill(temperature, own)
    other.fill(temperature, others)
    difference = others / own - 1.0
    if not np.isfinite(difference).any():
        return 0.0, low
    worst = int(np.nanargmax(np.abs(difference)))
    return float(difference[worst]), float(temperature[worst])


def _nothing(
    cas: str, prop: str, method: str | None, every: list[EngineCurve]
) -> MissingProperty | EngineError:
    """Why there is no curve."""
    faults = {
        f"{curve.engine}'s {curve.method}: {reason}"
        for curve in _found(cas, prop)
        if method in (None, curve.method) and (reason := exclusion_reason(cas, prop, curve.method))
    }
    hint = "Measured values go in with dropkit.fluid() or with_values()"
    if faults:
        return EngineError(
            f"No trustworthy {prop} of {cas} from an engine. {'; '.join(sorted(faults))}",
            allowed=", ".join(curve.method for curve in every),
            hint=hint,
        )
    asked = "no whitelisted method of CoolProp or thermo" if method is None else f"not {method}"
    return MissingProperty(
        f"{prop} of {cas}: {asked} has it within stated limits; estimates are not used",
        allowed=", ".join(curve.method for curve in every) or ", ".join(engine_properties(cas)),
        hint=hint,
    )
