"""Weighted, optionally robust least squares in one place, for pure liquids and for pairs."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from typing import Any

import numpy as np
from scipy.optimize import minimize_scalar

from record_builder import BuildError, Refused
from record_builder.forms import Array, Parameters, evaluate, model

__all__ = ["LARGEST_CONDITION", "balanced", "fit_form", "fit_redlich_kister", "solve"]

# Beyond this the columns (each scaled to length one) are not told apart by the data.
LARGEST_CONDITION = 1e7


def balanced(weights: Array, sources: Sequence[str], balance: bool) -> Array:
    """Square-root weights; with `balance` every source counts the same in total."""
    scaled = weights.copy()
    if balance:
        for source in set(sources):
            mine = np.array([name == source for name in sources])
            scaled[mine] *= len(sources) / weights[mine].sum()
    return np.asarray(np.sqrt(scaled))


def _robust_factor(residuals: Array, kind: str) -> Array:
    """Square roots of the weights that a robust loss gives to residuals (relative)."""
    spread = 1.4826 * float(np.median(np.abs(residuals)))
    if spread == 0.0:
        return np.ones_like(residuals)
    z = np.abs(residuals) / spread
    if kind == "huber":
        return np.asarray(np.sqrt(1.345 / np.maximum(z, 1.345)))
    if kind == "soft_l1":
        return np.asarray((1.0 + z**2) ** -0.25)
    raise BuildError(f"robust = {kind!r}; allowed: huber, soft_l1")


def _least_squares(matrix: Array, target: Array, ridge: float, what: str) -> Array:
    """Least squares on columns scaled to length one; refuses what the data cannot tell apart."""
    lengths = np.linalg.norm(matrix, axis=0)
    if matrix.shape[0] < matrix.shape[1] or not np.all(lengths > 0):
        raise Refused(
            f"{what}: {matrix.shape[0]} points for {matrix.shape[1]} coefficients, or a term "
            "that no point feels"
        )
    scaled = matrix / lengths
    singular = np.linalg.svd(scaled, compute_uv=False)
    if singular[-1] * LARGEST_CONDITION < singular[0]:
        raise Refused(
            f"{what}: condition {singular[0] / max(singular[-1], 1e-300):.2g} above "
            f"{LARGEST_CONDITION:.0e}; the points do not bear so many coefficients"
        )
    if ridge > 0.0:
        count = scaled.shape[1]
        scaled = np.vstack([scaled, np.sqrt(ridge) * np.eye(count)])
        target = np.concatenate([target, np.zeros(count)])
    solution = np.linalg.lstsq(scaled, target, rcond=None)[0]
    return np.asarray(solution / lengths)


def solve(
    matrix: Array, target: Array, weights: Array, robust: str, ridge: float, what: str
) -> Array:
    """Coefficients that minimise the weighted (robust) sum of squared residuals."""
    factor = np.ones_like(target)
    coefficients = np.zeros(matrix.shape[1])
    for _ in range(60 if robust else 1):
        w = weights * factor
        previous = coefficients
        coefficients = _least_squares(matrix * w[:, None], target * w, ridge, what)
        if not robust:
            break
        factor = _robust_factor(matrix @ coefficients - target, robust)
        if np.allclose(coefficients, previous, rtol=1e-12, atol=0.0):
            break
    return coefficients


def _rational(
    block: Mapping[str, Any], T: Array, y: Array, weights: Array, robust: str, what: str
) -> Parameters:
    """Numerator and denominator, the denominator of the last round as weight of the next."""
    p, q = (int(n) for n in block["degree"])
    low, high = block["range"]
    shape = {"centre": block.get("centre", (low + high) / 2)}
    shape["scale"] = block.get("scale", (high - low) / 2 or 1.0)
    z = (T - shape["centre"]) / shape["scale"]
    top = np.vander(z, p + 1, increasing=True)
    bottom = np.vander(z, q + 1, increasing=True)[:, 1:]
    denominator = np.ones_like(y)
    coefficients = np.zeros(p + 1 + q)
    for _ in range(30):
        scale = 1.0 / (y * denominator)
        matrix = np.column_stack([top, -bottom * y[:, None]]) * scale[:, None]
        previous = coefficients
        coefficients = solve(matrix, y * scale, weights, robust, 0.0, what)
        denominator = 1.0 + bottom @ coefficients[p + 1 :]
        if np.allclose(coefficients, previous, rtol=1e-12):
            break
    grid = np.linspace((low - shape["centre"]) / shape["scale"], 1.0, 400)
    if np.any(1.0 + np.vander(grid, q + 1, increasing=True)[:, 1:] @ coefficients[p + 1 :] <= 0):
        raise Refused(f"{what}: the denominator vanishes inside the range")
    return {
        "numerator": coefficients[: p + 1].tolist(),
        "denominator": [1.0, *coefficients[p + 1 :].tolist()],
        **shape,
    }


def fit_form(
    form: str, block: Mapping[str, Any], T: Array, y: Array, weights: Array, what: str
) -> Parameters:
    """Parameters of a temperature form that minimise relative deviations.

    `weights` are square roots (see `balanced`); all `y` must be positive.
    """
    if np.any(y <= 0):
        raise BuildError(f"{what}: values must be positive")
    robust = str(block.get("robust", ""))
    if form == "rational":
        return _rational(block, T, y, weights, robust, what)
    form_model = model(form, block)

    def linear(extra: float) -> tuple[Array, float]:
        columns = form_model.columns(T, extra)
        if form_model.space == "log":
            target = np.log(y) - form_model.offset(T)
        else:
            columns, target = columns / y[:, None], np.ones_like(y)
        found = solve(columns, target, weights, robust, 0.0, what)
        residuals = weights * (columns @ found - target)
        # A robust fit is also judged robustly while the nonlinear parameter is searched.
        cost = np.abs(residuals).sum() if robust else float(residuals @ residuals)
        return found, float(cost)

    extra = 0.0
    if form_model.search is not None:
        trials = form_model.search
        costs = []
        for trial in trials:
            try:
                costs.append(linear(float(trial))[1])
            except Refused:
                costs.append(np.inf)
        best = int(np.argmin(costs))
        if not np.isfinite(costs[best]):
            raise Refused(f"{what}: no value of the nonlinear parameter gives a sound fit")
        low, high = trials[max(best - 1, 0)], trials[min(best + 1, len(trials) - 1)]
        result = minimize_scalar(
            lambda value: linear(float(value))[1],
            bounds=(low, high),
            method="bounded",
            options={"xatol": 1e-9 * float(high - low)},
        )
        extra = float(result.x)
    found = linear(extra)[0]
    parameters = form_model.parameters(found, extra)
    back = evaluate(form, parameters, T)
    if not np.all(np.isfinite(back)) or np.any(back <= 0):
        raise Refused(f"{what}: the fit leaves the positive numbers at its own points")
    sums = form_model.columns(T, extra) @ found
    if form_model.space == "log":
        sums = np.exp(sums + form_model.offset(T))
    if not np.allclose(back, sums, rtol=1e-9):
        raise BuildError(f"{what}: form {form} reads these parameters otherwise than fitted")
    return parameters


def transformed(y: Array, transform: str) -> Array:
    """f(y) of the mixture form."""
    if transform == "log":
        return np.asarray(np.log(y))
    if transform == "reciprocal":
        return np.asarray(1.0 / y)
    if transform == "linear":
        return y
    raise BuildError(f"transform {transform!r}; allowed: log, reciprocal, linear")


def inverse(f: Array, transform: str) -> Array:
    """y from f(y)."""
    if transform == "log":
        return np.asarray(np.exp(f))
    return np.asarray(1.0 / f) if transform == "reciprocal" else f


def excess_columns(x1: Array, T: Array, columns: Sequence[int]) -> Array:
    """Columns x1 x2 (x1 - x2)^k th^j, th = (T - 298.15)/100, `columns[k]` powers in row k."""
    theta = (T - 298.15) / 100.0
    step = 2.0 * x1 - 1.0
    parts = [
        x1 * (1.0 - x1) * step**k * theta**j
        for k, count in enumerate(columns)
        for j in range(count)
    ]
    return np.column_stack(parts)


def fit_redlich_kister(
    x1: Array,
    T: Array,
    y: Array,
    ends: tuple[Array, Array],
    columns: Sequence[int],
    transform: str,
    weights: Array,
    *,
    robust: str = "",
    ridge: float = 1e-6,
    what: str = "pair",
) -> list[list[float]]:
    """Rows of coefficients that minimise relative deviations of y; the pure ends are given."""
    target = transformed(y, transform)
    target = target - x1 * transformed(ends[0], transform)
    target = target - (1.0 - x1) * transformed(ends[1], transform)
    # d ln y / d f: what a residual in f does to y, relatively.
    slope = {"log": np.ones_like(y), "reciprocal": y, "linear": 1.0 / y}[transform]
    matrix = excess_columns(x1, T, columns) * slope[:, None]
    found = solve(matrix, target * slope, weights, robust, ridge, what)
    width = max(columns)
    rows, start = [], 0
    for count in columns:
        row = [float(c) for c in found[start : start + count]]
        rows.append(row + [0.0] * (width - count))
        start += count
    return rows


def excess(x1: Array, T: Array, rows: Sequence[Sequence[float]]) -> Array:
    """x1 x2 sum c_kj (x1 - x2)^k th^j from stored rows."""
    flat = np.array([c for row in rows for c in row])
    return np.asarray(excess_columns(x1, T, [len(row) for row in rows]) @ flat)
