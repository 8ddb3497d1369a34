"""A user's own values: `fluid` for a liquid known by a few numbers, and overlays on any fluid."""

from __future__ import annotations

import math
from collections.abc import Callable, Mapping, Sequence
from dataclasses import replace
from typing import Any, Final

import numpy as np

from dropkit import units
from dropkit.errors import BadInput
from dropkit.properties import display
from dropkit.properties.cautions import STATIC_ACCUMULATOR
from dropkit.properties.curves import FloatArray
from dropkit.properties.interface import Fluid
from dropkit.properties.own_values import OwnCurve, read_values
from dropkit.properties.property_words import PROPERTIES, QUOTIENT, property_name
from dropkit.properties.trails import grade_with, versions
from dropkit.provenance import Trail
from dropkit.records import PropertyRecord
from dropkit.validity import Range

__all__ = ["OwnFluid", "fluid", "overlay"]

# Dynamic viscosity, where the kinematic one is given, is the first times the second.
PRODUCT: Final = ("kinematic_viscosity", "density")


def fluid(
    name: str,
    *,
    at: Any = None,
    uncertainty: Mapping[str, float] | None = None,
    plausible: bool = True,
    **values: Any,
) -> OwnFluid:
    """A liquid of your own, known by a few numbers.

    Parameters
    ----------
    name : str
        What tables call it.
    at : temperature, optional
        Where the numbers were measured [K]; they then hold within 0.5 K. Without it,
        numbers hold at all temperatures, and the assumptions say so.
    uncertainty : mapping, optional
        Relative standard uncertainty (k = 1) by property.
    plausible : bool
        False accepts values that no ordinary liquid has.
    **values
        Properties by name: a number (SI), one with a unit, or a list of
        ``(temperature, value)`` pairs, between which straight lines are drawn (in ln(value)
        over 1/T for viscosities and vapour pressure).

    Returns
    -------
    OwnFluid
        With the same interface as a liquid of the database; grade "own".

    Raises
    ------
    UnknownName
        For a property that does not exist.
    UnitError, ImplausibleValue, BadInput
        For a slip in a value, with the likely cure.

    Examples
    --------
    >>> import dropkit as dk
    >>> mine = dk.fluid(
    ...     "trial coating 7",
    ...     density="1050 kg/m3",
    ...     viscosity=[("20 degC", "5.1 mPa*s"), ("40 degC", "2.9 mPa*s")],
    ...     surface_tension="31 mN/m",
    ... )
    >>> round(mine.viscosity(303.15) * 1e3, 2)
    3.81
    """
    if not isinstance(name, str) or not name.strip():
        raise BadInput(f"The name of a fluid is text, not {name!r}")
    if not values:
        raise BadInput(f"{name} has no values", allowed="at least one of " + ", ".join(PROPERTIES))
    curves = read_values(values, at, plausible)
    if {"viscosity", "kinematic_viscosity"} <= curves.keys():
        raise BadInput(
            f"{name} has both viscosity and kinematic_viscosity",
            allowed="one of the two; the other follows from the density",
        )
    return _checked(OwnFluid(name, curves, spreads=_read_spreads(uncertainty, curves)))


def overlay(
    base: Fluid,
    values: Mapping[str, Any],
    *,
    at: Any,
    plausible: bool,
    uncertainty: Mapping[str, float] | None,
) -> OwnFluid:
    """`base` with some of its properties replaced; see `Fluid.with_values`."""
    if not values:
        raise BadInput("No values to replace", allowed="at least one of " + ", ".join(PROPERTIES))
    curves = read_values(values, at, plausible)
    if {"viscosity", "kinematic_viscosity"} <= curves.keys():
        raise BadInput("viscosity and kinematic_viscosity are both given", allowed="one of the two")
    trends = {}
    if at is not None:
        kelvin = units.single(at, "temperature", "at", plausible=plausible)
        for prop, curve in curves.items():
            if base._shape() == () and len(curve.values) == 1 and prop in base.available():
                trends[prop] = curve.values[0] / base._evaluate(prop, kelvin, "raise")
    spreads = _read_spreads(uncertainty, curves)
    return _checked(OwnFluid(base.name, curves, base=base, trends=trends, spreads=spreads))


def _read_spreads(given: Any, curves: Mapping[str, OwnCurve]) -> dict[str, float]:
    if given is None:
        return {}
    if not isinstance(given, Mapping):
        raise BadInput(
            f"uncertainty is {given!r}", allowed="a mapping such as {'viscosity': '2 %'}"
        )
    for prop in given:
        if property_name(prop) not in curves:
            raise BadInput(f"uncertainty of {prop}, but no value of it", allowed=", ".join(curves))
    return {prop: _spread(prop, value) for prop, value in given.items()}


def _checked(made: OwnFluid) -> OwnFluid:
    """The fluid, unless what follows from its values holds at no temperature."""
    for prop in made.available():
        limits = made._range(prop)
        if limits.low > limits.high:
            raise BadInput(f"{made.name}: {prop} would hold at no temperature")
    return made


class OwnFluid(Fluid):
    """A user's values, alone or on top of another fluid.

    Made by `fluid` and `Fluid.with_values`; see there for an example.

    Parameters
    ----------
    name : str
        What tables call it.
    curves : mapping
        The user's values by property.
    base : Fluid, optional
        The fluid that gives what the user's values don't.
    trends : mapping
        Properties that follow the base's temperature trend, with the factor on it.
    spreads : mapping
        Relative standard uncertainty by property.
    """

    def __init__(
        self,
        name: str,
        curves: Mapping[str, OwnCurve],
        *,
        base: Fluid | None = None,
        trends: Mapping[str, float] | None = None,
        spreads: Mapping[str, float] | None = None,
    ) -> None:
        super().__init__()
        self.name = name
        self._curves = dict(curves)
        self._base = base
        self._trends = dict(trends or {})
        self._spreads = dict(spreads or {})

    def __getstate__(self) -> dict[str, Any]:
        # The quick evaluators are functions of the moment; they are made again on use.
        return {**self.__dict__, "_fast": {}}

    # ------------------------------------------------ what Fluid asks for
    def available(self) -> tuple[str, ...]:
        """Names of the properties that are given or follow.

        Returns
        -------
        tuple of str
            In the order of tables.
        """
        held = set(self._curves)
        if self._base is not None:
            held.update(self._base.available())
        if "density" in held and "viscosity" in held:
            held.add("kinematic_viscosity")
        if "density" in held and "kinematic_viscosity" in held:
            held.add("viscosity")
        return tuple(prop for prop in PROPERTIES if prop in held)

    def _route(self, prop: str) -> str:
        """Where a property comes from: "trend", "own", "product" or "base"."""
        if prop in self._trends:
            return "trend"
        if prop in self._curves:
            return "own"
        if prop == "viscosity" and "kinematic_viscosity" in self._curves:
            return "product"
        return "base"

    def _is_quotient(self, prop: str) -> bool:
        return prop == "kinematic_viscosity" and prop not in self._curves

    def _from_base(self) -> Fluid:
        assert self._base is not None
        return self._base

    def _record_range(self, prop: str) -> Range:
        route = self._route(prop)
        if route == "own":
            return self._curves[prop].range
        if route == "product":
            first, second = (self._record_range(part) for part in PRODUCT)
            return Range(max(first.low, second.low), min(first.high, second.high))
        return self._from_base()._range(prop)

    def _record_blocks(self, prop: str) -> Sequence[PropertyRecord]:
        route = self._route(prop)
        if route == "product":
            return self._record_blocks("density")
        return () if route == "own" else self._from_base()._blocks(prop)

    def _shape(self) -> tuple[int, ...]:
        return self._base._shape() if self._base is not None else ()

    def _broadcast(self, shape: tuple[int, ...]) -> Fluid:
        if self._base is None or self._shape() == ():
            return self
        wide = self._base._broadcast(shape)
        return OwnFluid(
            self.name, self._curves, base=wide, trends=self._trends, spreads=self._spreads
        )

    def _record_scalar(self, prop: str) -> Callable[[float], float] | None:
        route = self._route(prop)
        if self._shape() != ():
            return None
        if route == "own":
            return self._curves[prop].scalar
        if route == "product":
            first, second = (self._record_scalar(part) for part in PRODUCT)
            assert first is not None
            assert second is not None
            kinematic, density = first, second
            return lambda temperature: kinematic(temperature) * density(temperature)
        value = self._from_base()._scalar(prop)
        if route == "trend" and value is not None:
            factor, inner = self._trends[prop], value
            return lambda temperature: factor * inner(temperature)
        return value

    def _record_fill(
        self, prop: str, part: slice, temperature: FloatArray, out: FloatArray
    ) -> None:
        route = self._route(prop)
        if route == "own":
            out[:] = self._curves[prop].array(temperature)
        elif route == "product":
            density = np.empty_like(out)
            self._record_fill("kinematic_viscosity", part, temperature, out)
            self._record_fill("density", part, temperature, density)
            np.multiply(out, density, out=out)
        else:
            self._from_base()._fill(prop, part, temperature, out)
            if route == "trend":
                out *= self._trends[prop]

    def _without_gaps(self, prop: str) -> bool:
        parts = QUOTIENT if self._is_quotient(prop) else (prop,)
        return all(
            self._route(part) in ("own", "product") or self._from_base()._without_gaps(part)
            for part in parts
        )

    def _composition_is_settled(self) -> bool:
        return self._base is None or self._base._composition_is_settled()

    def _record_settle(self, prop: str, temperature: Any, outside: str) -> Any:
        route = self._route(prop)
        if route == "product":
            return self._record_settle("density", temperature, outside)
        if route == "own" or self._base is None:
            return False
        return self._base._settle_point(prop, temperature, outside)

    def _record_trail(self, prop: str, temperature: float | FloatArray | None) -> Trail:
        route = self._route(prop)
        if route == "base":
            return self._from_base()._trail(prop, temperature)
        if route == "product":
            kinematic = self._curves["kinematic_viscosity"]
            method = f"kinematic viscosity times density ({kinematic.method})"
            density = self._record_trail("density", temperature)
            known = (self._spreads.get("kinematic_viscosity"), density.uncertainty)
            spread = None if None in known else math.hypot(*(x for x in known if x is not None))
            made = self._own_trail(
                prop, method, _constant("kinematic_viscosity", kinematic), density
            )
            return replace(made, uncertainty=spread)
        curve = self._curves[prop]
        if route == "trend":
            assumed = (f"{prop} follows the record's temperature trend away from the own value",)
            trend = self._from_base()._trail(prop, temperature)
            return self._own_trail(
                prop, f"{curve.method}, times the record's trend", assumed, trend
            )
        return self._own_trail(prop, curve.method, _constant(prop, curve), None)

    def _own_trail(
        self, prop: str, method: str, assumptions: tuple[str, ...], other: Trail | None
    ) -> Trail:
        """The trail of an own value, with that of the record which it leans on."""
        cautions = ("viscosity at low shear",) if prop == "viscosity" else ()
        leant = (*other.assumptions, *assumptions) if other else assumptions
        return Trail(
            quantity=prop,
            subject=self.name,
            method=method,
            grade=grade_with([other.grade] if other else []),
            uncertainty=self._spreads.get(prop),
            records=other.records if other else (),
            assumptions=tuple(dict.fromkeys(leant)),
            cautions=tuple(dict.fromkeys((*(other.cautions if other else ()), *cautions))),
            versions=versions(),
        )

    @property
    def cautions(self) -> tuple[str, ...]:
        """Those of the fluid underneath; of one's own fluid only its maker knows more."""
        texts = list(self._base.cautions) if self._base is not None else []
        if self._base is None:
            texts.append(f"{self.name}: own values; hazards are in its safety data sheet, not here")
        own = self._curves.get("electrical_conductivity")
        if own is not None and min(own.values) < STATIC_ACCUMULATOR:
            texts.append(f"{self.name}: below 50 pS/m, static accumulator")
        return tuple(texts)

    def __repr__(self) -> str:
        return display.fluid_text(self, f"Fluid {self.name}, own values")

    def _repr_html_(self) -> str:
        return display.fluid_html(self, f"Fluid {self.name}, own values")


def _constant(prop: str, curve: OwnCurve) -> tuple[str, ...]:
    return () if curve.temperatures else (f"{prop} held constant over temperature",)


def _spread(prop: str, value: Any) -> float:
    number = units.single(value, "ratio", f"uncertainty of {prop}")
    if not 0.0 <= number < 1.0:
        raise BadInput(f"The uncertainty of {prop} is {number:g}", allowed="relative, 0 to 1")
    return number
