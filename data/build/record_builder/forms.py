"""The temperature forms seen from the fitting side: values, and how each becomes linear.

Every form is fitted by weighted linear least squares in its natural space (relative deviation
for sums, logarithm for exponentials), with at most one parameter left over that a search in one
dimension finds. That has no start values to get wrong and no local minima worth fearing.
After a fit the library's own equation is run on the result and compared with the linear columns,
so that a parameter under a wrong name cannot slip through.
"""

from __future__ import annotations

from collections.abc import Callable, Mapping
from dataclasses import dataclass
from typing import Any

import numpy as np
from numpy.typing import NDArray

from dropkit.properties.equations import FORMS
from dropkit.properties.equations import evaluate as run
from record_builder import BuildError

__all__ = ["Array", "Model", "Parameters", "evaluate", "model", "parameter_names"]

Array = NDArray[np.float64]
Parameters = dict[str, Any]


def _powers(z: Array, count: int) -> Array:
    return np.vander(z, count, increasing=True)


def _reduced(p: Mapping[str, Any], T: Array) -> Array:
    if p.get("variable", "T") == "1/T":
        return np.asarray(p.get("scale", 1.0) / T - p.get("centre", 0.0))
    return np.asarray((T - p.get("centre", 0.0)) / p.get("scale", 1.0))


_WAGNER = [1.0, 1.5, 2.5, 5.0]


def evaluate(form: str, parameters: Mapping[str, Any], temperatures: Any) -> Array:
    """Values of a form at an array of temperatures, by the library's own equations.

    `parameters` may be a whole record block: what the form does not know is passed over.
    """
    if form not in FORMS:
        raise BuildError(f"form {form!r}; known: {', '.join(FORMS)}")
    T = np.atleast_1d(np.asarray(temperatures, dtype=float))
    known = {parameter.name for parameter in FORMS[form].parameters} | {"unit"}
    own = {name: value for name, value in parameters.items() if name in known}
    with np.errstate(all="ignore"):  # outside its domain a form gives NaN; callers look
        return np.asarray(run(FORMS[form].array(own, label=form), T))


def parameter_names(form: str) -> set[str]:
    """The keys that a form takes from a block."""
    return {parameter.name for parameter in FORMS[form].parameters} | {"unit"}


@dataclass(frozen=True)
class Model:
    """A form made linear: columns, the space of the fit, and the way back to parameters.

    `space` is "relative" (columns sum to the value) or "log" (to its logarithm, less `offset`).
    `search` holds trial values of the one parameter that stays nonlinear, or is None.
    """

    space: str
    columns: Callable[[Array, float], Array]
    parameters: Callable[[Array, float], Parameters]
    offset: Callable[[Array], Array] = np.zeros_like
    search: Array | None = None


def _needs(block: Mapping[str, Any], form: str, *names: str) -> list[Any]:
    missing = [name for name in names if name not in block]
    if missing:
        raise BuildError(f"form {form} needs {', '.join(missing)} in its block")
    return [block[name] for name in names]


def _in_z(block: Mapping[str, Any]) -> Parameters:
    low, high = block["range"]
    shape: Parameters = {}
    if block.get("variable", "T") == "1/T":
        shape = {"variable": "1/T", "centre": 1.0, "scale": 300.0}
    else:
        shape = {"centre": round((low + high) / 2, 2), "scale": round((high - low) / 2, 2) or 1.0}
    return shape | {name: block[name] for name in ("centre", "scale") if name in block}


def model(form: str, block: Mapping[str, Any]) -> Model:
    """How to fit a form with the fixed parameters that a spec's block gives.

    `rational` is the exception: see `fitting.fit_rational`.
    """
    low = block["range"][0]
    if form in ("polynomial", "exp_polynomial"):
        shape = _in_z(block)
        count = int(_needs(block, form, "degree")[0]) + 1
        return Model(
            "relative" if form == "polynomial" else "log",
            lambda T, _: _powers(_reduced(shape, T), count),
            lambda c, _: {"coefficients": c.tolist(), **shape},
        )
    if form == "constant":
        return Model(
            "relative",
            lambda T, _: np.ones((len(T), 1)),
            lambda c, _: {"value": float(c[0])},
        )
    if form == "vogel":
        return Model(
            "log",
            lambda T, c: np.column_stack([np.ones_like(T), 1.0 / (T - c)]),
            lambda c, extra: {"coefficients": [*c.tolist(), extra]},
            search=np.linspace(-0.5 * low, low - 15.0, 40),
        )
    if form == "antoine":
        unit = float(block.get("unit", 1.0))
        return Model(
            "log",
            lambda T, c: np.log(10.0) * np.column_stack([np.ones_like(T), -1.0 / (T + c)]),
            lambda c, extra: {"coefficients": [*c.tolist(), extra], "unit": unit},
            offset=lambda T: np.full_like(T, np.log(unit)),
            search=np.linspace(15.0 - low, 0.3 * low, 40),
        )
    if form == "critical_powers":
        Tc, exponents = _needs(block, form, "critical_temperature", "exponents")
        fixed = {"exponents": list(exponents), "critical_temperature": Tc}
        return Model(
            "relative",
            lambda T, _: (1.0 - T / Tc)[:, None] ** np.asarray(exponents),
            lambda c, _: {"coefficients": c.tolist(), **fixed},
        )
    if form == "guggenheim":
        (Tc,) = _needs(block, form, "critical_temperature")
        return Model(
            "log",
            lambda T, _: np.column_stack([np.ones_like(T), np.log(1.0 - T / Tc)]),
            lambda c, _: {
                "s0": float(np.exp(c[0])),
                "n": float(c[1]),
                "critical_temperature": Tc,
            },
        )
    if form == "rackett":
        (Tc,) = _needs(block, form, "critical_temperature")
        return Model(
            "log",
            lambda T, d: np.column_stack([np.ones_like(T), -(1.0 + (1.0 - T / Tc) ** d)]),
            lambda c, d: {"coefficients": [*np.exp(c).tolist(), Tc, d]},
            search=np.linspace(0.15, 0.6, 40),
        )
    if form == "dippr101":
        power = float(block.get("exponent", 2.0))
        return Model(
            "log",
            lambda T, _: np.column_stack([np.ones_like(T), 1.0 / T, np.log(T), T**power]),
            lambda c, _: {"coefficients": [*c.tolist(), power]},
        )
    if form == "wagner":
        Tc, pc = _needs(block, form, "critical_temperature", "critical_pressure")
        return Model(
            "log",
            lambda T, _: (Tc / T)[:, None] * (1.0 - T / Tc)[:, None] ** np.asarray(_WAGNER),
            lambda c, _: {
                "coefficients": c.tolist(),
                "exponents": _WAGNER,
                "critical_temperature": Tc,
                "critical_pressure": pc,
            },
            offset=lambda T: np.full_like(T, np.log(pc)),
        )
    if form == "watson":
        (Tc,) = _needs(block, form, "critical_temperature")
        terms = int(block.get("degree", 0)) + 1
        return Model(
            "log",
            lambda T, _: np.column_stack(
                [np.ones_like(T), _powers(T / Tc, terms) * np.log(1.0 - T / Tc)[:, None]]
            ),
            lambda c, _: {
                "coefficients": [float(np.exp(c[0])), *c[1:].tolist()],
                "critical_temperature": Tc,
            },
        )
    if form == "power":
        reference = float(block.get("reference_temperature", 298.15))
        return Model(
            "log",
            lambda T, _: np.column_stack([np.ones_like(T), np.log(T / reference)]),
            lambda c, _: {
                "A": float(np.exp(c[0])),
                "n": float(c[1]),
                "reference_temperature": reference,
            },
        )
    raise BuildError(f"form {form!r} cannot be fitted here; give published coefficients")
