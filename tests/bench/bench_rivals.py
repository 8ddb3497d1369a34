"""What a user would write or call instead: the rivals that dropkit's speed is measured against.

Two kinds. *Bare* is the one-line numpy expression of the very equation in a record, coefficients
typed in, temporaries and all: no range check, no units, no source. *Engines* are the array paths
that the manuals of CoolProp and thermo describe, for the saturated liquid.
"""

from __future__ import annotations

from collections.abc import Callable
from typing import Any

import numpy as np

from dropkit.records import PropertyRecord, liquid_record, pair_record

Curve = Callable[[Any], Any]


# ------------------------------------------------ bare numpy
def _horner(coefficients: Any, variable: str) -> str:
    """A polynomial in nested form; `variable` may assign itself at its first use (walrus)."""
    first, *rest = [repr(float(c)) for c in coefficients]
    if not rest:
        return first
    name = variable.strip("()").partition(":=")[0].strip() if ":=" in variable else variable
    inner = rest[-1]
    for value in reversed(rest[:-1]):
        inner = f"{value} + {name} * ({inner})"
    return f"{first} + {variable} * ({inner})"


def _reduced(parameters: Any) -> str:
    centre, scale = parameters.get("centre", 0.0), parameters.get("scale", 1.0)
    if parameters.get("variable") == "1/T":
        return f"(z := {scale!r} / T - {centre!r})"
    if centre == 0.0 and scale == 1.0:
        return "T"
    return f"(z := (T - {centre!r}) / {scale!r})"


def _powers(parameters: Any, base: str) -> str:
    pairs = sorted(zip(parameters["exponents"], parameters["coefficients"], strict=True))
    lowest = float(pairs[0][0])
    steps = [float(n) - lowest for n, _ in pairs]
    if all(abs(step - round(step)) < 1e-9 for step in steps):  # one power and a polynomial
        dense = [0.0] * (round(steps[-1]) + 1)
        for step, (_, s) in zip(steps, pairs, strict=True):
            dense[round(step)] += s
        return f"(t := {base}) ** {lowest!r} * ({_horner(dense, 't')})"
    (n0, s0), *rest = pairs
    return f"{s0!r} * (t := {base}) ** {n0!r}" + "".join(f" + {s!r} * t ** {n!r}" for n, s in rest)


def expression(record: PropertyRecord) -> str:
    """The equation of a record as one line of numpy in T."""
    p, form = record.parameters, record.form
    if form == "polynomial":
        return _horner(p["coefficients"], _reduced(p))
    if form == "exp_polynomial":
        return f"np.exp({_horner(p['coefficients'], _reduced(p))})"
    if form == "vogel":
        a, b, c = p["coefficients"]
        return f"np.exp({a!r} + {b!r} / (T - {c!r}))"
    if form == "critical_powers":
        factor = p.get("factor", 1.0)
        total = _powers(p, f"1 - T / {p['critical_temperature']!r}")
        return total if factor == 1.0 else f"{factor!r} * ({total})"
    if form == "powers":
        return _powers(p, f"T / {p['reference_temperature']!r}")
    if form == "rational":
        above = _horner(p["numerator"], _reduced(p))
        name = "z" if ":=" in _reduced(p) else "T"
        return f"({above}) / ({_horner(p['denominator'], name)})"
    if form == "guggenheim":
        return f"{p['s0']!r} * (1 - T / {p['critical_temperature']!r}) ** {p['n']!r}"
    if form == "rackett":
        a, b, c, d = p["coefficients"]
        return f"{a!r} / {b!r} ** (1 + (1 - T / {c!r}) ** {d!r})"
    if form == "dippr101":
        a, b, c, d, e = [*p["coefficients"], 0.0, 0.0][:5]
        return f"np.exp({a!r} + {b!r} / T + {c!r} * np.log(T) + {d!r} * T ** {e!r})"
    raise NotImplementedError(f"no bare one-liner for the form {form!r} yet")


def logarithm(record: PropertyRecord) -> str:
    """The same for the logarithm; whoever types an exponential leaves out exp and log."""
    text = expression(record)
    if text.startswith("np.exp(") and record.form in ("exp_polynomial", "vogel", "dippr101"):
        return text.removeprefix("np.exp")
    return f"np.log({text})"


def serving(key: str, prop: str, low: float, high: float, *, mixed: bool = False) -> PropertyRecord:
    """The first record of a liquid that holds throughout [low, high] K."""
    for record in liquid_record(key).properties[prop]:
        limits = (record.mixture_range if mixed else None) or record.range
        if limits.low <= low and high <= limits.high:
            return record
    raise LookupError(f"no single record of {key} gives {prop} from {low} to {high} K")


def compiled(text: str, arguments: str = "T") -> Curve:
    """A function of one line."""
    made: Curve = eval(f"lambda {arguments}: {text}", {"np": np})
    return made


def bare(key: str, prop: str, low: float, high: float) -> Curve:
    """The numpy one-liner for a pure liquid's property between two temperatures [K]."""
    return compiled(expression(serving(key, prop, low, high)))


def bare_viscosity_of_pair(first: str, second: str, low: float, high: float) -> Curve:
    """The numpy one-liner for the viscosity of a binary: (mass fraction of `first`, T) -> Pa*s."""
    pair = pair_record(first, second)
    assert pair is not None
    assert pair.components == (first, second)
    record = pair.properties["viscosity"][0]
    assert (record.parameters["transform"], record.parameters["basis"]) == ("log", "volume")
    room = [
        compiled(expression(serving(k, "density", 293.15, 293.15)))(293.15) for k in (first, second)
    ]
    ends = [logarithm(serving(key, "viscosity", low, high, mixed=True)) for key in (first, second)]
    excess, *rest = [_horner(row, "h") for row in reversed(record.parameters["coefficients"])]
    for row in rest:
        excess = f"{row} + d * ({excess})"
    # Three names more than one line, as anybody would; the expression is still one.
    text = (
        "def line(w, T):\n"
        f"    x = w / (w + (1 - w) * {room[0] / room[1]!r})\n"
        "    d, h = 2 * x - 1, (T - 298.15) / 100\n"
        f"    return np.exp(x * ({ends[0]}) + (1 - x) * ({ends[1]}) + x * (1 - x) * ({excess}))\n"
    )
    scope: dict[str, Any] = {"np": np}
    exec(text, scope)
    made: Curve = scope["line"]
    return made


# ------------------------------------------------ engines
def engines_water_viscosity() -> dict[str, Curve]:
    """Array paths for the viscosity of saturated liquid water, by the name of what is called."""
    import CoolProp
    from CoolProp.CoolProp import AbstractState, PropsSI
    from thermo import ViscosityLiquid

    state = AbstractState("HEOS", "Water")

    def low_level(T: Any) -> Any:
        out = np.empty_like(T)
        for i, kelvin in enumerate(T.tolist()):
            state.update(CoolProp.QT_INPUTS, 0.0, kelvin)
            out[i] = state.viscosity()
        return out

    viscosity = ViscosityLiquid(CASRN="7732-18-5")

    def thermo_loop(T: Any) -> Any:
        # Its objects take one temperature at a time; arrays are refused.
        return np.array([viscosity.T_dependent_property(kelvin) for kelvin in T.tolist()])

    return {
        "CoolProp PropsSI(array)": lambda T: PropsSI("V", "T", T, "Q", 0.0, "Water"),
        "CoolProp AbstractState loop": low_level,
        f"thermo ViscosityLiquid loop ({viscosity.method})": thermo_loop,
    }


def engines_water_density() -> dict[str, Curve]:
    """The same for density."""
    import CoolProp
    from CoolProp.CoolProp import AbstractState, PropsSI

    state = AbstractState("HEOS", "Water")

    def low_level(T: Any) -> Any:
        out = np.empty_like(T)
        for i, kelvin in enumerate(T.tolist()):
            state.update(CoolProp.QT_INPUTS, 0.0, kelvin)
            out[i] = state.rhomass()
        return out

    return {
        "CoolProp PropsSI(array)": lambda T: PropsSI("D", "T", T, "Q", 0.0, "Water"),
        "CoolProp AbstractState loop": low_level,
    }


def engines_water_surface_tension() -> dict[str, Curve]:
    """The same for surface tension."""
    from CoolProp.CoolProp import PropsSI
    from thermo import SurfaceTension

    tension = SurfaceTension(CASRN="7732-18-5")

    def thermo_loop(T: Any) -> Any:
        return np.array([tension.T_dependent_property(kelvin) for kelvin in T.tolist()])

    return {
        "CoolProp PropsSI(array)": lambda T: PropsSI("I", "T", T, "Q", 0.0, "Water"),
        f"thermo SurfaceTension loop ({tension.method})": thermo_loop,
    }


ENGINES: dict[str, Callable[[], dict[str, Curve]]] = {
    "viscosity": engines_water_viscosity,
    "density": engines_water_density,
    "surface_tension": engines_water_surface_tension,
}


def tabulated_water_viscosity(folder: str) -> Curve:
    """CoolProp's batch call on a bicubic table of compressed water at 101325 Pa.

    Not the saturated liquid, and up to 2.3 % off (20 to 40 degC), but the fastest call there is
    (CoolProp 8; described in its header file and type stub). The table takes 20 s to
    build and is kept in `folder`.
    """
    import CoolProp
    import CoolProp.CoolProp as module

    module.set_config_string(CoolProp.ALTERNATIVE_TABLES_DIRECTORY, f"{folder}/")
    state = module.AbstractState("BICUBIC&HEOS", "Water")
    outputs = np.array([CoolProp.iviscosity], dtype=np.int32)

    def call(T: Any) -> Any:
        out, status = np.empty((T.size, 1)), np.zeros(T.size, dtype=np.int32)
        pressure = np.full(T.size, 101325.0)
        state.fast_evaluate(CoolProp.PT_INPUTS, pressure, T, outputs, out, status)
        return out[:, 0]

    return call
