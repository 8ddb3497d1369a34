"""What errors about units say: what was given, what is needed, and the cure.

They do not name the argument; :mod:`dropkit.units` puts its name in front.
"""

from __future__ import annotations

from typing import Any, Final, NoReturn

from dropkit.errors import BadInput, UnitError
from dropkit.unit_table import (
    KINDS,
    LENGTH,
    NONE,
    STANDARD_ATMOSPHERE,
    TEMPERATURE,
    VISCOSITY,
    Dimension,
    Kind,
)

__all__ = ["bad_form", "mark_error", "mismatch", "named", "needs", "shown"]


def bad_form(why: str, kind: Kind, hint: str = "") -> BadInput:
    """The error for input that is no number in any form that is read."""
    unit = f" in {kind.si}" if kind.si else ""
    return BadInput(why, allowed=f"a number or array{unit}, or {needs(kind)}", hint=hint)


def needs(kind: Kind) -> str:
    """What a kind needs, with an example."""
    if not kind.si:
        return f"{kind.words}, such as {'0.38 or ' + repr('38 %') if kind.accepts else '1.5'}"
    units = kind.si if kind.stock == kind.si else f"{kind.si} or {kind.stock}"
    return (
        f"{kind.words} in {units}, such as '{25 if kind.name == 'temperature' else 1} {kind.stock}'"
    )


_DEGREES: Final = ("deg", "°", "degree", "degrees")


def mismatch(unit: str, dimension: Dimension, kind: Kind) -> UnitError:
    """The error for a unit of another dimension, with the cure where the slip is common."""
    others = [other for other in KINDS.values() if other.dimension == dimension]
    names = {other.name for other in others}
    what = "a pure number" if dimension == NONE else others[0].words if others else "something else"
    hint = ""
    if kind.dimension == VISCOSITY and "kinematic_viscosity" in names:
        what, hint = (
            "a kinematic viscosity",
            ("Multiply it by the density: 4 cSt at 1050 kg/m3 is 4.2 mPa*s"),
        )
    elif kind.name == "kinematic_viscosity" and "viscosity" in names:
        hint = "Divide it by the density: 4.2 mPa*s at 1050 kg/m3 is 4 cSt"
    elif kind.name == "mass_flow" and "flow" in names:
        hint = "Multiply it by the density"
    elif kind.name == "flow" and "mass_flow" in names:
        hint = "Divide it by the density"
    elif kind.name in ("heat_of_vaporisation", "heat_capacity") and dimension[5]:
        hint = "Divide it by the molar mass"
    elif kind.dimension == LENGTH and "resolution" in names:
        hint = "Dots per length give a pitch: 600 dpi is 42.33 um"
    elif kind.dimension == TEMPERATURE and unit in _DEGREES:
        what = "an angle"
        cure = "'degC' or 'degF'" if kind.name == "temperature" else "'K'"
        hint = f"A degree alone names no scale: write {cure}"
    elif dimension == NONE and kind.si:
        hint = f"Write '1 {kind.stock}', or a bare number in {kind.si}"
    return UnitError(f"{unit!r} measures {what}", allowed=needs(kind), hint=hint)


_CURES: Final = {
    "temperature": "A difference is written in K or delta_degC, such as '5 K'",
    "difference": "A temperature is written in K or degC, such as '25 degC'",
    "cycle": "Revolutions are a frequency; write 1/s",
    "angular": "An angle per time is a frequency; write 1/s",
    "dpi": "600 dpi is a pitch of 42.33 um: write the length or 1/mm",
    "needle": "A needle gauge stands for an inner diameter; write the length in um",
    "angle": "An angle is no fraction or ratio; write a plain number",
    "brix": "Degrees Brix are per cent of sucrose by mass",
    "humidity": "Relative humidity is no fraction of a liquid",
    "percent": "Write a plain number",
}


def mark_error(unit: str, mark: str, kind: Kind) -> UnitError:
    """The error for a unit that has the right dimension and yet does not fit the kind."""
    if mark in ("gauge", "absolute"):
        letter = mark[0]
        bare = unit.replace(f"({letter})", "").removesuffix(letter).rstrip(" _")
        standard = f"{STANDARD_ATMOSPHERE:g} Pa"
        if mark == "gauge" and "absolute" in kind.accepts:
            cure = f"Add the ambient pressure (standard {standard}) and write '{bare}(a)'"
        elif mark == "absolute" and "gauge" in kind.accepts:
            cure = f"Subtract the ambient pressure (standard {standard}) and write '{bare}(g)'"
        else:
            cure = f"It is neither gauge nor absolute; write '{bare}'"
    else:
        cure = _CURES.get(mark, "Convert it to the basis that is asked for, then write '%'")
    return UnitError(f"{unit!r} does not fit {kind.words}", allowed=needs(kind), hint=cure)


def shown(value: Any) -> str:
    """A value as it was given, in at most 60 characters."""
    try:
        text = " ".join(repr(value).split())
    except Exception:  # a foreign object may fail to show itself
        text = f"<{type(value).__name__}>"
    return text if len(text) <= 60 else f"{text[:57]}..."


def named(name: str, value: Any, error: BadInput) -> NoReturn:
    """Raise an error again with the argument and what it got in front."""
    what = f"{name} = {shown(value)}: {error.what}"
    raise type(error)(what, allowed=error.allowed, choices=error.choices, hint=error.hint) from None
