"""What to know before use: flash points, static charge, hazards, and phases at a temperature.

These texts remind; the safety data sheet, local codes and licensed practice decide.
"""

from __future__ import annotations

from collections.abc import Iterable
from typing import Any, Final

import numpy as np

from dropkit import records
from dropkit.properties.curves import Curve
from dropkit.records import LiquidRecord

__all__ = ["liquid_cautions", "liquid_phases", "mixture_cautions", "mixture_phases"]

# Below this conductivity a liquid keeps the charge that flow puts on it.
STATIC_ACCUMULATOR: Final = 50e-12  # S/m; common practice
FIRE_NOTE: Final = (
    "the mixture's flash point is not predicted; a mist or foam can burn below it; water does "
    "not make it non-flammable; follow the safety data sheet and local codes"
)


def liquid_cautions(record: LiquidRecord) -> list[str]:
    """Flash point with its method, static charge, hazard notes, and the record's own cautions."""
    texts = []
    flash = record.facts.get("flash_point")
    if flash:
        method = flash.get("method", "method not stated")
        celsius = flash["value"] - 273.15
        texts.append(f"{record.name}: flash point {celsius:.0f} degC ({method}; {flash['source']})")
    blocks = record.properties.get("electrical_conductivity", ())
    lowest = [Curve([block]).scalar(block.range.low) for block in blocks]
    said = any("static accumulator" in text for text in record.cautions)
    if any(value < STATIC_ACCUMULATOR for value in lowest) and not said:
        texts.append(f"{record.name}: below 50 pS/m, static accumulator")
    notes = (record.facts.get("hazards") or {}).get("notes", ())
    texts += [f"{record.name}: {note}" for note in notes]
    texts += [f"{record.name}: {text}" for text in record.cautions]
    return texts


def mixture_cautions(keys: Iterable[str]) -> list[str]:
    """Those of the components, and what their flash points don't say of the mixture."""
    texts: list[str] = []
    fire = False
    for key in keys:
        record = records.liquid_record(key)
        texts += liquid_cautions(record)
        fire = fire or "flash_point" in record.facts
    return [*texts, FIRE_NOTE] if fire else texts


def _span(temperature: Any) -> tuple[float, float] | None:
    if temperature is None or not np.isfinite(temperature).any():
        return None
    return float(np.nanmin(temperature)), float(np.nanmax(temperature))


def liquid_phases(record: LiquidRecord, temperature: Any) -> list[str]:
    """``supercooled`` below the melting point, the pressure needed above the boiling point."""
    span = _span(temperature)
    if span is None:
        return []
    low, high = span
    texts = []
    if record.melting_point is not None and low < record.melting_point:
        melts = record.melting_point - 273.15
        texts.append(f"supercooled: {record.name} melts at {melts:.1f} degC")
    if record.boiling_point is not None and high > record.boiling_point:
        need = "needs pressure"
        blocks = record.properties.get("vapour_pressure", ())
        curve = Curve(blocks) if blocks else None
        if curve is not None and curve.range.low <= high <= curve.range.high:
            need = f"needs p >= {curve.scalar(high) / 1e5:.3g} bar (absolute)"
        boils = record.boiling_point - 273.15
        texts.append(f"{need} to stay liquid: {record.name} boils at {boils:.1f} degC at 1 atm")
    return texts


def mixture_phases(keys: Iterable[str], temperature: Any) -> list[str]:
    """Where a component would boil or freeze by itself; the mixture's points aren't predicted."""
    span = _span(temperature)
    if span is None:
        return []
    low, high = span
    texts = []
    for key in keys:
        record = records.liquid_record(key)
        if record.kind != "liquid":
            continue
        if record.boiling_point is not None and high > record.boiling_point:
            texts.append(
                f"above the boiling point of {record.name} "
                f"({record.boiling_point - 273.15:.1f} degC): may need pressure to stay liquid"
            )
        if record.melting_point is not None and low < record.melting_point:
            texts.append(
                f"below the melting point of {record.name} "
                f"({record.melting_point - 273.15:.1f} degC): freezing is not predicted"
            )
    return texts
