"""CoolProp's saturated liquid, by CAS number.

Asked at (T, Q = 0), never at (T, p): above the boiling point the latter returns the vapour without
a word. Temperatures are checked against the fluid's own limits first, because CoolProp writes
infinity into arrays where it raises for a float.
"""

from __future__ import annotations

import json
import re
import sys
from collections.abc import Mapping
from functools import cache
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.errors import EngineError
from dropkit.properties.curves import FloatArray
from dropkit.properties.engines.engine_types import EngineCurve, inside_liquid
from dropkit.provenance import Grade
from dropkit.records import LOCK

__all__ = [
    "COOLPROP_LETTERS",
    "COOLPROP_METHOD",
    "CoolPropFluid",
    "coolprop_curve",
    "coolprop_fluid",
]

COOLPROP_METHOD: Final = "HEOS"

# Property -> CoolProp's letter, and relative standard uncertainty (k = 1): half of what 95 % of
# the differences from published values, or else from the handbooks, stay below. Surface tension is
# not among them: thermo's method REFPROP holds the same equations, with the limits that CoolProp
# leaves out (it gives sulfur dioxide a negative surface tension at 418 K).
COOLPROP_LETTERS: Final[dict[str, tuple[str, float]]] = {
    "density": ("D", 0.001),
    "viscosity": ("V", 0.02),
    "vapour_pressure": ("P", 0.008),
    "heat_of_vaporisation": ("H", 0.005),
    "heat_capacity": ("C", 0.01),
    "thermal_conductivity": ("L", 0.025),
    "speed_of_sound": ("A", 0.004),
}
# Kinds of transport models that predict by way of another fluid: they are served, and say so.
_PREDICTIONS: Final[dict[str, str]] = {
    "ECS": "extended corresponding states",
    "rhosr-CS": "corresponding states of the residual entropy",
}


class CoolPropFluid(NamedTuple):
    """What CoolProp tells of a pure fluid.

    Parameters
    ----------
    name : str
        CoolProp's name; passed to CoolProp, never taken from a user.
    low : float
        Lowest temperature of the saturated liquid [K].
    critical_temperature : float
        Critical temperature [K].
    papers : mapping
        Property to CoolProp's key of the paper behind it; only properties that it has.
    kinds : mapping
        ``viscosity`` and ``thermal_conductivity`` to the kind of model, where it has one name.
    formula : str
        Molecular formula.
    molar_mass : float
        [kg/mol].
    melting_point : float
        Triple point [K], within some hundredths of a kelvin of the melting point at 1 atm.
    """

    name: str
    low: float
    critical_temperature: float
    papers: Mapping[str, str]
    kinds: Mapping[str, str]
    formula: str
    molar_mass: float
    melting_point: float


@cache
def _engine() -> Any:
    """CoolProp's module of functions; imported at first use, which takes seconds and says so."""
    if "CoolProp.CoolProp" not in sys.modules:
        # Imported here: only the first use needs it. A line of the log, because a warning would
        # stop programs that turn warnings into errors.
        import logging

        logging.getLogger("dropkit").warning(
            "dropkit asks the engine CoolProp for the first time: importing it takes seconds, "
            "once in a process"
        )
    try:
        import CoolProp.CoolProp as engine
    except ImportError as error:
        raise EngineError(
            f"the engine CoolProp cannot be imported ({error})", hint="Install dropkit again"
        ) from None
    return engine


@cache
def _version() -> str:
    return str(_engine().get_global_param_string("version"))


@cache
def _names() -> Mapping[str, str]:
    """CAS number -> CoolProp's name, for every fluid."""
    engine = _engine()
    fluids = engine.get_global_param_string("FluidsList").split(",")
    return {engine.get_fluid_param_string(name, "CAS"): name for name in fluids}


@cache
def _described(cas: str) -> CoolPropFluid | None:
    name = _names().get(cas)
    if name is None:
        return None
    found = json.loads(_engine().get_fluid_param_string(name, "JSON"))
    fluid = found[0] if isinstance(found, list) else found
    equation = fluid["EOS"][0]
    if equation["pseudo_pure"]:  # a mixture treated as one fluid: dew and bubble points differ
        return None
    paper = equation.get("BibTeX_EOS", "")
    papers = dict.fromkeys(
        ("density", "vapour_pressure", "heat_of_vaporisation", "heat_capacity", "speed_of_sound"),
        paper,
    )
    kinds = {}
    for prop, key in (("viscosity", "viscosity"), ("thermal_conductivity", "conductivity")):
        model = fluid.get("TRANSPORT", {}).get(key)
        model = model[0] if isinstance(model, list) else model
        if model:
            papers[prop] = model.get("BibTeX", "")
            kinds[prop] = model.get("type", "")
    critical = fluid["STATES"]["critical"]["T"]
    # Some equations end above the triple point.
    low = max(equation["Ttriple"], equation["STATES"]["sat_min_liquid"]["T"])
    formula = re.sub(r"[_{}]", "", fluid["INFO"]["FORMULA"])
    return CoolPropFluid(
        name,
        low,
        critical,
        papers,
        kinds,
        formula,
        float(equation["molar_mass"]),
        float(equation["Ttriple"]),
    )


def coolprop_fluid(cas: str) -> CoolPropFluid | None:
    """What CoolProp tells of a pure fluid, or None where it doesn't know it.

    Parameters
    ----------
    cas : str
        CAS registry number, already checked.

    Raises
    ------
    EngineError
        If CoolProp is missing or describes the fluid in a way that is not known.

    Examples
    --------
    >>> coolprop_fluid("110-82-7").name
    'CycloHexane'
    """
    with LOCK:
        try:
            return _described(cas)
        except (LookupError, TypeError, ValueError) as error:
            raise EngineError(
                f"CoolProp {_version()} describes {cas} in a way that is not known ({error!r})",
                hint="dropkit knows CoolProp 8.0.0",
            ) from None


def coolprop_curve(cas: str, prop: str) -> EngineCurve | None:
    """What CoolProp gives for the saturated liquid of a chemical, or None.

    Parameters
    ----------
    cas : str
        CAS registry number, already checked.
    prop : str
        The word of the interface, such as ``"density"``.

    Returns
    -------
    EngineCurve or None
        None where CoolProp doesn't know the fluid, or has no such property of it.

    Raises
    ------
    EngineError
        If CoolProp is missing.

    Examples
    --------
    >>> coolprop_curve("67-66-3", "density") is None
    True
    """
    if prop not in COOLPROP_LETTERS:
        return None
    fluid = coolprop_fluid(cas)
    if fluid is None or prop not in fluid.papers:
        return None
    kind = fluid.kinds.get(prop, "")
    if kind == "Chung":  # an estimate from the critical point, nothing fitted
        return None
    limits = inside_liquid(fluid.low, fluid.critical_temperature, fluid.critical_temperature)
    if limits is None:
        return None
    letter, uncertainty = COOLPROP_LETTERS[prop]
    grade: Grade = "single"
    cautions: tuple[str, ...] = ()
    if kind in _PREDICTIONS:
        grade, uncertainty = "estimated", 0.1
        cautions = (f"CoolProp predicts it by {_PREDICTIONS[kind]}: an estimate",)
    asked = _Asked(fluid.name, letter)
    return EngineCurve(
        cas=cas,
        name=fluid.name,
        quantity=prop,
        engine="CoolProp",
        version=_version(),
        method=COOLPROP_METHOD,
        form=_PREDICTIONS.get(kind, "reference equation, saturated liquid at (T, Q = 0)"),
        place=f"CoolProp's paper {fluid.papers[prop] or 'not named'}",
        range=limits,
        uncertainty=uncertainty,
        grade=grade,
        sources=("Bell2014",),
        cautions=cautions,
        bodies=(asked.one, asked.many),
    )


class _Asked(NamedTuple):
    """One property of one fluid at saturation, as CoolProp's functions are asked for it."""

    fluid: str
    letter: str

    def one(self, temperature: float) -> float:
        ask = _engine().PropsSI
        value = float(ask(self.letter, "T", temperature, "Q", 0.0, self.fluid))
        if self.letter == "H":
            return float(ask("H", "T", temperature, "Q", 1.0, self.fluid)) - value
        return value

    def many(self, temperature: FloatArray, out: FloatArray) -> None:
        ask = _engine().PropsSI
        try:
            out[...] = ask(self.letter, "T", temperature, "Q", 0.0, self.fluid)
            if self.letter == "H":
                np.subtract(ask("H", "T", temperature, "Q", 1.0, self.fluid), out, out=out)
        except ValueError:
            # CoolProp refuses an array in which no element has a value.
            out[...] = np.nan
