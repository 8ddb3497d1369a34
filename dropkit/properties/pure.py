"""Pure liquids from dropkit's own records or the engines, and `liquid`, which finds them."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from typing import Any

import numpy as np

from dropkit import records
from dropkit.errors import BadInput, DropkitWarning, MissingProperty, NotALiquid, warn_user
from dropkit.properties.curves import Curve, FloatArray
from dropkit.properties.interface import Fluid
from dropkit.properties.other_chemicals import (
    FROM_ENGINES,
    awake,
    from_engines,
    key_of,
    missing_from_engines,
    with_engines,
)
from dropkit.properties.property_words import PROPERTIES, QUOTIENT
from dropkit.properties.trails import record_use, relative_uncertainty, versions
from dropkit.provenance import Trail, worst_grade
from dropkit.validity import Range

__all__ = ["Liquid", "liquid"]


def liquid(name: str, *, engines: bool = False) -> Liquid:
    """A pure liquid by name, synonym, trade short form or CAS number.

    Names mean dropkit's own records. A CAS number that none of them holds is asked of CoolProp and
    of the handbook tables of thermo; the first such question of a process takes seconds and says
    so in the log ``dropkit``.

    Parameters
    ----------
    name : str
        Such as ``"water"``, ``"IPA"`` or ``"56-81-5"``; any chemical by CAS number.
    engines : bool
        True asks the engines also for the properties that the record lacks. What the record holds
        is neither replaced nor extended.

    Returns
    -------
    Liquid
        With every property as a method of temperature.

    Raises
    ------
    UnknownName
        With the nearest names; for a CAS number, what the engines have of it.
    AmbiguousName
        For names such as ``"xylene"`` that stand for several liquids.
    NotALiquid
        For a solid that dropkit knows as a solute only.
    BadInput
        For what is no text, or a CAS number whose last digit does not check.
    EngineError
        If an engine is missing or unreadable.

    Examples
    --------
    >>> import dropkit as dk
    >>> round(dk.liquid("water").density(293.15), 1)
    998.2

    Bromobenzene has no record; the engines have it:

    >>> bromobenzene = dk.liquid("108-86-1")
    >>> round(bromobenzene.density(298.15)), bromobenzene.grade("density")
    (1488, 'single')
    """
    if not isinstance(engines, bool):
        raise BadInput(f"engines={engines!r}", allowed="True or False")
    return _load(key_of(name), engines)


def _load(key: str, engines: bool = False) -> Liquid:
    record = records.liquid_record(awake(key))
    return Liquid(with_engines(record) if engines else record, engines=engines)


class Liquid(Fluid):
    """A pure saturated liquid, read from its record.

    Made by `liquid`; see there for an example.

    Parameters
    ----------
    record : LiquidRecord
        The record, as `dropkit.records.liquid_record` gives it.
    engines : bool
        Whether the engines were asked for what the record lacks.
    """

    def __init__(self, record: records.LiquidRecord, *, engines: bool = False) -> None:
        super().__init__()
        if record.kind != "liquid":
            raise NotALiquid(
                f"{record.name} is a solid: it is a solute here, not a liquid",
                hint=f"Use it in a mixture: mixture({{'{record.name}': 0.1, 'water': 'rest'}}, "
                "by='mass')",
            )
        self.record = record
        self.key = record.key
        self.name = record.name
        self._engines = engines or from_engines(record)
        self._curves: dict[str, Curve] = {}

    def __reduce__(self) -> tuple[Any, ...]:
        return (_load, (self.key, self._engines))

    def __eq__(self, other: object) -> bool:
        return isinstance(other, Liquid) and other.record == self.record

    def __hash__(self) -> int:
        return hash(("Liquid", self.key))

    # ------------------------------------------------ facts
    @property
    def cas(self) -> str:
        """CAS registry number."""
        return self.record.cas

    @property
    def formula(self) -> str:
        """Molecular formula."""
        return self.record.formula

    @property
    def molar_mass(self) -> float:
        """Molar mass [kg/mol]."""
        return self.record.molar_mass

    @property
    def melting_point(self) -> float | None:
        """Melting point at 101325 Pa [K], where the record has it."""
        return self.record.melting_point

    @property
    def boiling_point(self) -> float | None:
        """Boiling point at 101325 Pa [K], where the record has it."""
        return self.record.boiling_point

    @property
    def critical_temperature(self) -> float | None:
        """Critical temperature [K], where the record has it."""
        return self.record.critical_temperature

    @property
    def heat_of_fusion(self) -> float | None:
        """Heat of fusion at the melting point [J/kg], where the record has it."""
        fact = self.record.facts.get("heat_of_fusion")
        return float(fact["value"]) if fact else None

    @property
    def solid_density(self) -> float | None:
        """Density of the solid [kg/m3], where the record has it."""
        fact = self.record.facts.get("solid_density")
        return float(fact["value"]) if fact else None

    @property
    def flash_point(self) -> dict[str, Any] | None:
        """Flash point: value [K], method, source and place; None where the record has none."""
        fact = self.record.facts.get("flash_point")
        return dict(fact) if fact else None

    @property
    def cautions(self) -> tuple[str, ...]:
        """What to know before use: flash point, static charge, hazards, surface state."""
        from dropkit.properties.cautions import liquid_cautions

        return tuple(liquid_cautions(self.record))

    # ------------------------------------------------ what Fluid asks for
    def available(self) -> tuple[str, ...]:
        """Names of the properties that the record holds, kinematic viscosity included.

        Returns
        -------
        tuple of str
            In the order of tables.
        """
        held = self.record.properties
        return tuple(
            prop
            for prop in PROPERTIES
            if prop in held or (prop == "kinematic_viscosity" and self._has_quotient())
        )

    def _has_quotient(self) -> bool:
        """Whether density and viscosity are there, and hold at common temperatures."""
        held = self.record.properties
        if "density" not in held or "viscosity" not in held:
            return False
        density, viscosity = self._record_range("density"), self._record_range("viscosity")
        return max(density.low, viscosity.low) < min(density.high, viscosity.high)

    def _missing(self, prop: str) -> MissingProperty:
        if self._engines:
            return missing_from_engines(self.record, prop)
        problem = super()._missing(prop)
        if prop not in FROM_ENGINES:
            return problem
        hint = f"{problem.hint}; or ask the engines: liquid({self.name!r}, engines=True)"
        return MissingProperty(problem.what, allowed=problem.allowed, hint=hint)

    def _not_finite(self, prop: str, count: int) -> float:
        parts = QUOTIENT if self._is_quotient(prop) else (prop,)
        if not any(self.curve(part).by_engine for part in parts):
            return super()._not_finite(prop, count)
        many = "1 value" if count == 1 else f"{count} values"
        warn_user(
            f"{prop} of {self.name}: engines are not extrapolated; {many} outside the stated "
            "range became NaN",
            DropkitWarning,
        )
        return float("nan")

    def curve(self, prop: str, *, inside_mixtures: bool = False) -> Curve:
        """The compiled records of a property; for dropkit's own layers.

        Parameters
        ----------
        prop : str
            A property that the record holds.
        inside_mixtures : bool
            Use the wider range that a record may state for use inside mixtures only.

        Returns
        -------
        Curve
            Made once.

        Raises
        ------
        MissingProperty
            The record does not hold it.
        """
        name = f"{prop}+" if inside_mixtures else prop
        if name not in self._curves:
            if prop not in self.record.properties:
                raise self._missing(prop)
            blocks = self.record.properties[prop]
            self._curves[name] = Curve(blocks, inside_mixtures=inside_mixtures)
        return self._curves[name]

    def _record_blocks(self, prop: str) -> Sequence[records.PropertyRecord]:
        return self.record.properties[prop]

    def _record_range(self, prop: str) -> Range:
        return self.curve(prop).range

    def _record_scalar(self, prop: str) -> Callable[[float], float]:
        return self.curve(prop).scalar

    def _record_fill(
        self, prop: str, part: slice, temperature: FloatArray, out: FloatArray
    ) -> None:
        self.curve(prop).fill(temperature, out)

    def _record_trail(self, prop: str, temperature: float | FloatArray | None) -> Trail:
        from dropkit.properties.cautions import liquid_phases

        curve = self.curve(prop)
        serving = _serving(curve, temperature)
        blocks = [curve.records[number] for number in serving]
        value = None if temperature is None else _smallest(curve, temperature)
        cautions = [text for block in blocks for text in block.cautions]
        if prop == "viscosity":
            cautions.append("viscosity at low shear")
        cautions += liquid_phases(self.record, temperature)
        return Trail(
            quantity=prop,
            subject=self.name,
            method="; ".join(dict.fromkeys(f"{b.form} ({b.obtained})" for b in blocks)),
            grade=worst_grade(block.grade for block in blocks),
            uncertainty=None
            if temperature is not None and value is None
            else max(relative_uncertainty(block, value) for block in blocks),
            records=tuple(record_use(block) for block in blocks),
            cautions=tuple(dict.fromkeys(cautions)),
            versions=versions(blocks),
        )

    # ------------------------------------------------ display
    @property
    def _title(self) -> str:
        parts = [f"Liquid {self.name}", self.cas and f"CAS {self.cas}", self.formula]
        if from_engines(self.record):
            parts.append("from CoolProp and handbook tables")
        elif self._engines:
            parts.append("what the record lacks from CoolProp and handbook tables")
        return ", ".join(filter(None, parts))

    def __repr__(self) -> str:
        from dropkit.properties import display

        return display.fluid_text(self, self._title)

    def _repr_html_(self) -> str:
        from dropkit.properties import display

        return display.fluid_html(self, self._title)


def _serving(curve: Curve, temperature: float | FloatArray | None) -> list[int]:
    """Numbers of the records that serve some temperatures; all of them for None."""
    if temperature is None or len(curve.records) == 1:
        return list(range(len(curve.records)))
    kelvin = np.unique(np.asarray(temperature, dtype=float))
    return sorted({curve.serving(t) for t in kelvin[~np.isnan(kelvin)]}) or [0]


def _smallest(curve: Curve, temperature: float | FloatArray) -> float | None:
    """The smallest value over some temperatures, clear of the ends of the range."""
    kelvin = np.asarray(temperature, dtype=float).reshape(-1)
    kelvin = kelvin[(kelvin >= curve.range.low) & (kelvin <= curve.range.high)]
    if not kelvin.size:
        return None
    out = np.empty(kelvin.size)
    curve.fill(np.ascontiguousarray(kelvin), out)
    return float(out.min())
