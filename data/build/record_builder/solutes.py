"""Forms of a dissolved solid acting on its solvent, on the points of a pair: values and fits."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from typing import Any

import numpy as np

from dropkit.properties.mixing import electrolytes, solutions
from record_builder import BuildError, Refused
from record_builder.forms import Array, Parameters

__all__ = ["SOLUTE_FITS", "SOLUTE_FORMS"]


def _density(
    p: Mapping[str, Any], T: Array, w: Array, solvent: Array, masses: tuple[float, float]
) -> Array:
    salt = electrolytes.apparent_density(p, w, T)
    return np.asarray(1.0 / ((1.0 - w) / solvent + w / salt))


def _viscosity(
    p: Mapping[str, Any], T: Array, w: Array, solvent: Array, masses: tuple[float, float]
) -> Array:
    salt = electrolytes.apparent_viscosity(p, w, T)
    return np.asarray(np.exp((1.0 - w) * np.log(solvent) + w * np.log(salt)))


def _surface_tension(
    p: Mapping[str, Any], T: Array, w: Array, solvent: Array, masses: tuple[float, float]
) -> Array:
    salt, rest = w / masses[0], (1.0 - w) / masses[1]
    ratio = electrolytes.surface_tension_ratio(p, salt / (salt + rest), solvent, T)
    return np.asarray(solvent * ratio)


def _fraction(basis: str, w: Array, masses: tuple[float, float]) -> Array:
    if basis not in ("mass", "mole"):
        raise BuildError(f"basis {basis!r} of a solute; allowed: mass, mole")
    moles = (1.0 - w) / masses[1]
    return np.asarray(solutions.solute_fraction(basis, w, masses[0], moles))


def _polynomial(
    p: Mapping[str, Any], T: Array, w: Array, solvent: Array, masses: tuple[float, float]
) -> Array:
    return np.asarray(solutions.dissolved(p, solvent, _fraction(p["basis"], w, masses), T))


def fit_polynomial(
    block: Mapping[str, Any],
    T: Array,
    w: Array,
    y: Array,
    solvent: Array,
    masses: tuple[float, float],
    roots: Array,
    what: str,
) -> Parameters:
    """Coefficients of `solute_polynomial` by weighted linear least squares on relative deviations.

    `rows` powers of the fraction, each with `columns` powers of th (one number, or one per row).
    """
    transform = str(block.get("transform", "log"))
    if transform not in solutions.TRANSFORMS:
        raise BuildError(f"{what}: transform {transform!r}; allowed: log, ratio, linear")
    basis = str(block.get("basis", "mass"))
    centre = float(block.get("centre", solutions.CENTRE))
    scale = float(block.get("scale", solutions.SCALE))
    rows, listed = int(block["rows"]), block["columns"]
    columns = [int(listed)] * rows if isinstance(listed, int) else [int(c) for c in listed]
    if len(columns) != rows or min(columns) < 1:
        raise BuildError(f"{what}: rows = {rows} does not go with columns = {listed}")
    x, th = _fraction(basis, w, masses), (T - centre) / scale
    powers = [(i, j) for i, count in enumerate(columns, 1) for j in range(count)]
    if len(y) <= len(powers):
        raise Refused(f"{what}: {len(y)} points for {len(powers)} coefficients")
    weight = {"log": 1.0, "ratio": solvent / y, "linear": 1.0 / y}[transform] * roots
    target = {"log": np.log(y / solvent), "ratio": y / solvent - 1.0, "linear": y - solvent}
    matrix = np.column_stack([x**i * th**j for i, j in powers]) * np.asarray(weight)[:, None]
    lengths = np.linalg.norm(matrix, axis=0)
    if not lengths.all():
        raise Refused(f"{what}: the points do not tell all coefficients apart")
    found, _, rank, _ = np.linalg.lstsq(matrix / lengths, target[transform] * weight, rcond=1e-10)
    if rank < len(powers):
        raise Refused(f"{what}: the points bear {rank} of {len(powers)} coefficients")
    numbers = iter((found / lengths).tolist())
    parameters: Parameters = {
        "transform": transform,
        "basis": basis,
        "coefficients": [[next(numbers) for _ in range(count)] for count in columns],
    }
    if centre != solutions.CENTRE:
        parameters["centre"] = centre
    if scale != solutions.SCALE:
        parameters["scale"] = scale
    return parameters


SOLUTE_FORMS: dict[
    str, Callable[[Mapping[str, Any], Array, Array, Array, tuple[float, float]], Array]
] = {
    "laliberte_density": _density,
    "laliberte_viscosity": _viscosity,
    "dutcher_surface_tension": _surface_tension,
    "solute_polynomial": _polynomial,
}
SOLUTE_FITS = {"solute_polynomial": fit_polynomial}
