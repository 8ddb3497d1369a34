"""Solves a stream: from any sufficient set of its quantities to all of them, for arrays.

The unknowns are three logarithms: D of the jet's diameter, u of its speed, and s of the
wavelength over the diameter. Drop volume, frequency, flow and wavelength are linear in them; the
hole and the pressure are not, nor is the most unstable wavelength. However the three facts are
chosen, elimination leaves one unknown at a time, so that each root is found inside a bracket.
"""

from __future__ import annotations

import math
from collections.abc import Mapping
from dataclasses import dataclass
from functools import lru_cache
from typing import Any, Final

import numpy as np

from dropkit.design.stream_hole import Hole
from dropkit.design.stream_roots import highest_root
from dropkit.models import jet

__all__ = ["FACTS", "Liquid", "Solved", "choose", "most_unstable_ratio", "solve"]

_AREA: Final = math.log(math.pi / 4.0)

# Coefficients of D, u and s, and the constant: ln(value) = row . (D, u, s) + constant.
LINEAR: Final[dict[str, tuple[tuple[float, float, float], float]]] = {
    "drop_volume": ((3.0, 0.0, 1.0), _AREA),
    "frequency": ((-1.0, 1.0, -1.0), 0.0),
    "flow": ((2.0, 1.0, 0.0), _AREA),
    "velocity": ((0.0, 1.0, 0.0), 0.0),
    "jet_diameter": ((1.0, 0.0, 0.0), 0.0),
    "wavelength_ratio": ((0.0, 0.0, 1.0), 0.0),
}
# What the others depend on, for counting independent facts only.
_DIRECTIONS: Final[dict[str, tuple[float, float, float]]] = {
    **{word: row for word, (row, _) in LINEAR.items()},
    "nozzle_diameter": (1.0, 0.0, 0.0),
    "gauge_pressure": (-0.41, 1.83, 0.0),
    "most_unstable": (0.0, 0.0, 1.0),
}
FACTS: Final = tuple(word for word in _DIRECTIONS if word != "most_unstable")
# Of sets that agree, the first ones decide.
_ORDER: Final = (
    "drop_volume", "frequency", "flow", "velocity", "jet_diameter", "wavelength_ratio",
    "nozzle_diameter", "gauge_pressure",
)  # fmt: skip

_STEPS: Final = 40
_SIZES: Final = (math.log(1e-8), math.log(0.3))
_SPEEDS: Final = (math.log(1e-6), math.log(1e5))
_FLOWS: Final = (math.log(1e-22), math.log(10.0))


@dataclass(frozen=True, slots=True)
class Liquid:
    """What the solver needs of a liquid, floats or arrays [SI]."""

    density: Any
    viscosity: Any
    surface_tension: Any


@dataclass(frozen=True, slots=True)
class Solved:
    """Logarithms of the three unknowns and the hole, NaN where undetermined or impossible.

    Parameters
    ----------
    size, speed, ratio : ndarray
        Logarithms of jet diameter [m], speed [m/s] and wavelength over diameter.
    nozzle_diameter : ndarray
        Of the hole [m].
    used : tuple of str
        The facts that decided, ``"most_unstable"`` among them where it was assumed.
    roots : ndarray of int
        How many solutions were seen.
    """

    size: Any
    speed: Any
    ratio: Any
    nozzle_diameter: Any
    used: tuple[str, ...]
    roots: Any


@lru_cache(maxsize=1)
def _ratio_table() -> tuple[Any, Any]:
    """Logarithm of the Ohnesorge number, and of the full optimum over Weber's."""
    numbers = np.geomspace(1e-7, 1e7, 4001)
    # rho = gamma = d = 1 makes the viscosity the Ohnesorge number on the diameter.
    full = jet.most_unstable_wavelength_viscous_full.si(1.0, numbers, 1.0, np.ones_like(numbers))
    weber = math.sqrt(2.0) * math.pi * np.sqrt(1.0 + 3.0 * numbers)
    return np.log(numbers), np.log(full / weber)


def most_unstable_ratio(liquid: Liquid, jet_diameter: Any) -> Any:
    """The fastest-growing wavelength over the jet's diameter, full viscous relation, to 1e-8.

    Parameters
    ----------
    liquid : Liquid
        Density, viscosity, surface tension.
    jet_diameter : float or array
        Diameter of the jet [m].

    Returns
    -------
    ndarray
        The ratio [-].
    """
    with np.errstate(all="ignore"):
        oh = liquid.viscosity / np.sqrt(liquid.density * liquid.surface_tension * jet_diameter)
        at, log_share = _ratio_table()
        share = np.exp(np.interp(np.log(oh), at, log_share))
        return math.sqrt(2.0) * math.pi * np.sqrt(1.0 + 3.0 * oh) * share


def _rank(words: tuple[str, ...]) -> int:
    rows = [_DIRECTIONS[word] for word in words]
    return int(np.linalg.matrix_rank(np.array(rows))) if rows else 0


@lru_cache(maxsize=512)
def choose(given: frozenset[str]) -> tuple[str, ...]:
    """The independent facts among those given, with the most unstable wave if it must be assumed.

    Parameters
    ----------
    given : frozenset of str
        Words of `FACTS`.

    Returns
    -------
    tuple of str
        At most three.
    """
    used: tuple[str, ...] = ()
    for word in _ORDER:
        if word in given and _rank((*used, word)) > len(used):
            used = (*used, word)
    if len(used) < 3 and _rank((*used, "most_unstable")) > len(used):
        used = (*used, "most_unstable")
    return used


class _Problem:
    """One pattern of facts for n designs."""

    def __init__(self, liquid: Liquid, values: Mapping[str, Any], hole: Hole, n: int) -> None:
        self.liquid, self.hole, self.shape = liquid, hole, (n,)
        self.values = {word: np.broadcast_to(value, (n,)) for word, value in values.items()}
        self.roots = np.ones(n, dtype=int)

    def row(self, word: str) -> tuple[Any, Any]:
        """Coefficients and right-hand side of a linear fact."""
        row, constant = LINEAR[word]
        return np.array(row), np.log(self.values[word]) - constant

    def wave(self, size: Any) -> Any:
        return np.log(most_unstable_ratio(self.liquid, np.exp(size)))

    def residual(self, word: str, size: Any, speed: Any, steps: int = 30) -> Any:
        """How far a jet is from a given hole or pressure, as a logarithm."""
        liquid, hole = self.liquid, self.hole
        diameter, flow = np.exp(size), np.exp(2.0 * size + speed + _AREA)
        if word == "nozzle_diameter":
            given = self.values[word]
            narrow = hole.contraction_of(liquid.density, liquid.viscosity, flow, given)
            return size - np.log(narrow * given)
        bore: Any = self.values.get("nozzle_diameter")
        if bore is None:
            bore = hole.diameter_of(liquid.density, liquid.viscosity, flow, diameter, steps)
        return np.log(self.pressure(flow, bore)) - np.log(self.values["gauge_pressure"])

    def pressure(self, flow: Any, bore: Any) -> Any:
        liquid = self.liquid
        return self.hole.pressure(
            liquid.density, liquid.viscosity, liquid.surface_tension, flow, bore
        ).total

    def root(self, function: Any, span: tuple[float, float], rough: Any = None) -> Any:
        found, count = highest_root(function, *span, self.shape, rough=rough)
        self.roots = np.where(self.roots == 1, count, np.minimum(self.roots, count))
        return found

    def root_of(self, word: str, at: Any, span: tuple[float, float]) -> Any:
        """Where hole or pressure is as given; `at` gives size and speed from the unknown."""

        def miss(t: Any, steps: int = 30) -> Any:
            size, speed = at(t)
            return self.residual(word, size, speed, steps)

        return self.root(miss, span, lambda t: miss(t, 1))

    # ------------------------------------------------ the cases
    def both_of_hole(self) -> tuple[Any, Any]:
        """Size and speed from hole and pressure."""
        bore, given = self.values["nozzle_diameter"], self.values["gauge_pressure"]
        liquid = self.liquid

        def excess(y: Any) -> Any:
            parts = self.hole.pressure(
                liquid.density, liquid.viscosity, liquid.surface_tension, np.exp(y), bore
            )
            # Without the capillary part pressure goes as flow to a power between 1 and 2.
            return np.log(parts.total - parts.capillary) - np.log(given - parts.capillary)

        before = _AREA + np.log(bore * bore * np.sqrt(2.0 * given / liquid.density))
        miss = excess(before)
        now = before - 0.6 * miss
        for _ in range(_STEPS):
            its = excess(now)
            slope = (its - miss) / (now - before)
            slope = np.where((slope > 0.8) & (slope < 4.0), slope, 1.5)
            before, miss = now, its
            now = now - its / slope
            open_ones = np.abs(now - before) > 4e-16 * np.abs(now)
            if not np.any(open_ones):
                break
        if np.any(np.abs(excess(now)) > 1e-9):  # rows that secants did not bring home
            now = self.root(excess, _FLOWS)
        self.roots = np.where(np.isfinite(now), self.roots, 0)
        flow = np.exp(now)
        narrow = self.hole.contraction_of(liquid.density, liquid.viscosity, flow, bore)
        size = np.log(narrow * bore)
        return size, now - _AREA - 2.0 * size

    def without_speed(self, row: Any, right: Any) -> Any:
        """Size from a linear fact without the speed, beside the most unstable wave."""
        if row[2] == 0.0:
            return right / row[0]
        size = (right - row[2] * 1.5) / row[0]
        for _ in range(_STEPS):
            # The optimum depends on the size through the Ohnesorge number alone, weakly.
            oh = self._ohnesorge(size)
            slope = row[0] - row[2] * 0.75 * oh / (1.0 + 3.0 * oh)
            step = (row[0] * size + row[2] * self.wave(size) - right) / slope
            size = size - step
            if not np.any(np.abs(step) > 1e-14):
                break
        return size

    def _ohnesorge(self, size: Any) -> Any:
        liquid = self.liquid
        return liquid.viscosity / np.sqrt(liquid.density * liquid.surface_tension * np.exp(size))

    def solve(self, used: tuple[str, ...]) -> tuple[Any, Any, Any]:
        """The three logarithms."""
        nan = np.full(self.shape, np.nan)
        straight = [self.row(word) for word in used if word in LINEAR]
        bent = [word for word in used if word in ("nozzle_diameter", "gauge_pressure")]
        best = "most_unstable" in used
        if len(bent) == 2:
            size, speed = self.both_of_hole()
            if best:
                return size, speed, self.wave(size)
            if not straight:
                return size, speed, nan
            row, right = straight[0]
            return size, speed, (right - row[0] * size - row[1] * speed) / row[2]
        if best:
            return self._with_best(straight, bent)
        if len(straight) + len(bent) < 3:
            return self._partly(straight, nan)
        if len(straight) == 3:
            matrix = np.array([row for row, _ in straight])
            found = np.linalg.solve(matrix, np.array([right for _, right in straight]))
            return found[0], found[1], found[2]
        return self._on_line(straight, bent[0])

    def _with_best(self, straight: Any, bent: list[str]) -> tuple[Any, Any, Any]:
        nan = np.full(self.shape, np.nan)
        fast = [(row, right) for row, right in straight if row[1] != 0.0]
        slow = [(row, right) for row, right in straight if row[1] == 0.0]
        if len(fast) == 2:  # eliminate the speed between them
            (row, right), (other, its) = fast
            slow = [(row / row[1] - other / other[1], right / row[1] - its / other[1])]
        if slow:
            size = self.without_speed(*slow[0])
            ratio = self.wave(size)
            if fast:
                row, right = fast[0]
                return size, (right - row[0] * size - row[2] * ratio) / row[1], ratio
            if not bent:
                return size, nan, ratio
            speed = self.root_of(bent[0], lambda u: (size, u), _SPEEDS)
            return size, speed, ratio
        if not (fast and bent):
            known = fast[0] if fast else None
            speed = known[1] if known is not None and not known[0][[0, 2]].any() else nan
            return nan, speed, nan
        row, right = fast[0]

        def speed_at(size: Any) -> Any:
            return (right - row[0] * size - row[2] * self.wave(size)) / row[1]

        size = self.root_of(bent[0], lambda D: (D, speed_at(D)), _SIZES)
        return size, speed_at(size), self.wave(size)

    def _partly(self, straight: Any, nan: Any) -> tuple[Any, Any, Any]:
        """What fewer than three facts still decide: whatever the linear ones have in common."""
        if not straight:
            return nan, nan, nan
        matrix = np.array([row for row, _ in straight])
        rights = np.array([right for _, right in straight])
        inverse = np.linalg.pinv(matrix)
        projector = inverse @ matrix
        found = inverse @ rights
        decided = [abs(projector[i, i] - 1.0) < 1e-9 for i in range(3)]
        size, speed, ratio = (found[i] if decided[i] else nan for i in range(3))
        return size, speed, ratio

    def _on_line(self, straight: Any, word: str) -> tuple[Any, Any, Any]:
        """Two linear facts leave a line; hole or pressure finds the point on it."""
        matrix = np.array([row for row, _ in straight])
        start = np.linalg.pinv(matrix) @ np.array([right for _, right in straight])
        along = np.cross(matrix[0], matrix[1])
        lead = 0 if abs(along[0]) > 1e-9 else 1
        along = along / along[lead]
        start = start - along[:, None] * start[lead]

        def at(t: Any) -> tuple[Any, Any, Any]:
            return start[0] + along[0] * t, start[1] + along[1] * t, start[2] + along[2] * t

        return at(self.root_of(word, lambda t: at(t)[:2], _SIZES if lead == 0 else _SPEEDS))


def solve(liquid: Liquid, values: Mapping[str, Any], hole: Hole, n: int) -> Solved:
    """Solve n designs that give the same words.

    Parameters
    ----------
    liquid : Liquid
        Floats or arrays of n.
    values : mapping
        Facts: word of `FACTS` to float or array of n [SI].
    hole : Hole
        Kind and length of the hole.
    n : int
        Number of designs.

    Returns
    -------
    Solved
        NaN where undetermined, or where no jet does it.
    """
    used = choose(frozenset(values))
    problem = _Problem(liquid, values, hole, n)
    with np.errstate(all="ignore"):
        size, speed, ratio = problem.solve(used)
        bore = problem.values.get("nozzle_diameter")
        if bore is None:
            flow, diameter = np.exp(2.0 * size + speed + _AREA), np.exp(size)
            if "jet_diameter" in used:
                diameter = problem.values["jet_diameter"]
            bore = hole.diameter_of(liquid.density, liquid.viscosity, flow, diameter)
    size, speed, ratio = (np.broadcast_to(x, (n,)) for x in (size, speed, ratio))
    return Solved(size, speed, ratio, np.broadcast_to(bore, (n,)), used, problem.roots)
