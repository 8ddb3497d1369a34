"""Pure liquids from dropkit's own records, and `liquid`, which finds them by name."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from typing import Any

import numpy as np

from dropkit import records
from dropkit.errors import NotALiquid
from dropkit.properties.catalogue import resolve
from dropkit.properties.curves import Curve, FloatArray
from dropkit.properties.interface import Fluid
from dropkit.properties.property_words import PROPERTIES
from dropkit.properties.trails import record_use, relative_uncertainty, versions
from dropkit.provenance import Trail, worst_grade
from dropkit.validity import Range

__all__ = ["Liquid", "liquid"]


def liquid(name: str) -> Liquid:
    """A pure liquid by name, synonym, trade short form or CAS number.

    Parameters
    ----------
    name : str
        Such as ``"water"``, ``"IPA"`` or ``"56-81-5"``.

    Returns
    -------
    Liquid
        With every property as a method of temperature.

    Raises
    ------
    UnknownName
        With the nearest names.
    AmbiguousName
        For names such as ``"xylene"`` that stand for several liquids.
    NotALiquid
        For a solid that dropkit knows as a solute only.

    Examples
    --------
    >>> import dropkit as dk
    >>> round(dk.liquid("water").density(293.15), 1)
    998.2
    """
    return _load(resolve(name))


def _load(key: str) -> Liquid:
    return Liquid(records.liquid_record(key))


class Liquid(Fluid):
    """A pure saturated liquid, read from its record.

    Made by `liquid`; see there for an example.

    Parameters
    ----------
    record : LiquidRecord
        The record, as `dropkit.records.liquid_record` gives it.
    """

    def __init__(self, record: records.LiquidRecord) -> None:
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
        self._curves: dict[str, Curve] = {}

    def __reduce__(self) -> tuple[Any, ...]:
        return (_load, (self.key,))

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
            if prop in held
            or (prop == "kinematic_viscosity" and "density" in held and "viscosity" in held)
        )

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
            versions=versions(),
        )

    # ------------------------------------------------ display
    def __repr__(self) -> str:
        from dropkit.properties import display

        return display.fluid_text(self, f"Liquid {self.name}, CAS {self.cas}, {self.formula}")

    def _repr_html_(self) -> str:
        from dropkit.properties import display

        return display.fluid_html(self, f"Liquid {self.name}, CAS {self.cas}, {self.formula}")


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
