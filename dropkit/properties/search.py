"""Which composition or temperature gives a wanted property: all solutions in range, or none."""

from __future__ import annotations

from collections.abc import Callable, Mapping
from dataclasses import dataclass
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit import units
from dropkit.errors import BadInput, CompositionError, UnknownName, nearest
from dropkit.properties import display
from dropkit.properties.composition import Composition, check_basis, to_mass
from dropkit.properties.curves import FloatArray
from dropkit.properties.interface import Fluid
from dropkit.properties.mixtures import Mixture
from dropkit.properties.property_words import property_name

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["Found", "find"]

POINTS: Final = 1001


@dataclass(frozen=True)
class Found:
    """The solutions of a search.

    Parameters
    ----------
    quantity : str
        What was wanted.
    target : float
        The wanted value [SI].
    vary : str
        The component that was varied, or ``"temperature"``.
    by : str
        Basis of the fractions.
    values : tuple of float
        All solutions: fractions, or temperatures [K]; in rising order.
    fluids : tuple of Fluid
        The fluid at each solution.
    between : tuple of float
        Ends of the search.
    reaches : tuple of float
        Lowest and highest value [SI] of the property between them.
    asked : Asked, optional
        How it was asked; `solutions` come as Quantities where it is given.
    """

    quantity: str
    target: float
    vary: str
    by: str
    values: tuple[float, ...]
    fluids: tuple[Fluid, ...]
    between: tuple[float, float]
    reaches: tuple[float, float]
    asked: units.Asked | None = None

    @property
    def solutions(self) -> list[Any]:
        """All solutions as they were asked: fractions, kelvin, or temperatures with a unit."""
        if self.vary != "temperature":
            return list(self.values)
        return [units.give(value, "temperature", self.asked) for value in self.values]

    def __len__(self) -> int:
        return len(self.values)

    def __bool__(self) -> bool:
        return bool(self.values)

    @property
    def message(self) -> str:
        """The answer in one line."""
        unit = display.unit_of(self.quantity)
        shown = [
            f"{display.number(display.in_stock(self.quantity, value))} {unit}"
            for value in (self.target, *self.reaches)
        ]
        if self.vary == "temperature":
            ends = [f"{end - 273.15:.4g} degC" for end in self.between]
            found = ", ".join(f"{value - 273.15:.5g} degC" for value in self.values)
        else:
            ends = [f"{100 * end:.4g} %" for end in self.between]
            found = ", ".join(
                f"{100 * value:.5g} % {self.vary} by {self.by}" for value in self.values
            )
        if not self.values:
            return (
                f"{self.quantity} = {shown[0]}: none; between {ends[0]} and {ends[1]} "
                f"{self.vary} it reaches from {shown[1]} to {shown[2]}"
            )
        return f"{self.quantity} = {shown[0]} at {found}"

    def __repr__(self) -> str:
        return self.message

    def _repr_html_(self) -> str:
        return f"<p>{display.escape(self.message)}</p>"

    @property
    def sources(self) -> tuple[str, ...]:
        """Keys of the sources that the property of the found fluids rests on."""
        keys = (key for fluid in self.fluids for key in fluid.trail(self.quantity).sources)
        return tuple(dict.fromkeys(keys))

    def table(self) -> pd.DataFrame:
        """One row per solution: what was varied, the composition by mass, the grade.

        Returns
        -------
        pandas.DataFrame
            Empty where there is no solution.

        Examples
        --------
        >>> import dropkit as dk
        >>> table = dk.liquid("water").find(viscosity="0.5 mPa*s").table()
        >>> print(f"{table['temperature [K]'][0]:.1f}")
        328.6
        """
        import pandas as pd

        label = "temperature [K]" if self.vary == "temperature" else f"{self.vary} by {self.by}"
        rows = []
        for value, fluid in zip(self.values, self.fluids, strict=True):
            row: dict[str, Any] = {label: value, "fluid": fluid.name}
            if isinstance(fluid, Mixture):
                row |= {f"{key} [wt%]": 100 * w for key, w in fluid.mass_fractions.items()}
            rows.append({**row, "grade": fluid.grade(self.quantity)})
        return pd.DataFrame(rows, columns=None if rows else [label, "fluid", "grade"])

    def to_dict(self) -> dict[str, Any]:
        """A dict of plain types that survives JSON; `from_dict` rebuilds the result.

        Returns
        -------
        dict
            Everything but fluids that are no mixtures.

        Examples
        --------
        >>> import dropkit as dk
        >>> ink = dk.mixture({"glycerol": 0.3, "water": "rest"}, by="mass")
        >>> found = ink.find(viscosity="4.5 mPa*s", at="20 degC")
        >>> type(found).from_dict(found.to_dict()).message == found.message
        True
        """
        mixtures = [fluid for fluid in self.fluids if isinstance(fluid, Mixture)]
        return {
            "kind": "Found",
            "quantity": self.quantity,
            "target": self.target,
            "vary": self.vary,
            "by": self.by,
            "values": list(self.values),
            "mass_fractions": [fluid.mass_fractions for fluid in mixtures],
            "made": [
                {
                    "assumptions": list(fluid.assumptions),
                    "rest": fluid._composition.rest,
                    "estimates": fluid._estimates,
                }
                for fluid in mixtures
            ],
            "between": list(self.between),
            "reaches": list(self.reaches),
            "in_units": self.asked is not None,
            "message": self.message,
        }

    @classmethod
    def from_dict(cls, data: dict[str, Any]) -> Found:
        """Rebuild a result from `to_dict`; fluids come back where they are mixtures.

        Parameters
        ----------
        data : dict
            What `to_dict` gave, also after a passage through JSON.

        Returns
        -------
        Found
            With the same solutions.

        Raises
        ------
        BadInput
            The dict of something else.
        """
        needed = {"quantity", "target", "vary", "by", "values", "mass_fractions", "between",
                  "reaches", "in_units", "made"}  # fmt: skip
        if not isinstance(data, dict) or data.get("kind") != "Found" or not needed <= data.keys():
            raise BadInput("This is no dict of a Found", allowed="what Found.to_dict() gave")
        fluids = tuple(
            Mixture(
                Composition(
                    tuple(parts), tuple(parts.values()), tuple(made["assumptions"]), made["rest"]
                ),
                estimates=made["estimates"],
                quiet=True,
            )
            for parts, made in zip(data["mass_fractions"], data["made"], strict=True)
        )
        return cls(
            data["quantity"], data["target"], data["vary"], data["by"], tuple(data["values"]),
            fluids, tuple(data["between"]), tuple(data["reaches"]),
            units.Asked() if data["in_units"] else None,
        )  # fmt: skip


def find(
    fluid: Fluid,
    target: Mapping[str, Any],
    *,
    at: Any,
    vary: str | None,
    between: tuple[Any, Any] | None,
    by: str,
    plausible: bool,
) -> Found:
    """See `Fluid.find`, which calls this."""
    if len(target) != 1:
        raise BadInput(
            f"find takes one property, not {len(target)}", allowed="such as viscosity='4.5 mPa*s'"
        )
    ((prop, wanted),) = target.items()
    property_name(prop)
    check_basis(by)
    value, asked = units.read(wanted, prop, prop, plausible=plausible)
    if not isinstance(value, float) or np.isnan(value):
        raise BadInput(f"The wanted {prop} is {wanted!r}", allowed="one finite value")
    if fluid._shape() != ():
        raise BadInput(f"{fluid.name} has an array of compositions", allowed="one composition")
    if vary is None and at is None:
        vary = "temperature"
    elif vary is None and isinstance(fluid, Mixture):
        free = [key for key in fluid.components if key != fluid._composition.rest]
        if len(free) != 1:
            raise BadInput(
                "find needs vary=", allowed=", ".join((*fluid.components, "temperature"))
            )
        vary = free[0]
    if vary is not None and not isinstance(vary, str):
        raise BadInput(f"vary={vary!r}", allowed="the name of a component, or 'temperature'")
    if vary == "temperature":
        return _by_temperature(fluid, prop, value, at, between, asked)
    if at is None:
        raise BadInput("find needs at=, the temperature", allowed="such as at='20 degC'")
    kelvin = units.single(at, "temperature", "at", plausible=plausible)
    if not isinstance(fluid, Mixture):
        raise BadInput(
            f"{fluid.name} has no composition to vary",
            allowed="a mixture, or vary='temperature'",
        )
    return _by_composition(fluid, prop, value, kelvin, vary, between, by, asked)


def _by_temperature(
    fluid: Fluid, prop: str, value: float, at: Any, between: Any, asked: units.Asked | None
) -> Found:
    if at is not None:
        raise BadInput("at= fixes the temperature that is to be varied", allowed="one of the two")
    if prop not in fluid.available():
        raise fluid._missing(prop)
    limits = fluid._range(prop)
    low, high = limits.low, limits.high
    if between is not None:
        low, high = _ends(between, "temperature", (low, high))
    if not np.isfinite(high):
        raise BadInput(
            f"{prop} of {fluid.name} is a constant over all temperatures",
            allowed="between=(low, high), or a property that depends on temperature",
        )
    grid = np.linspace(low, high, POINTS)
    scalar = fluid._scalar(prop)
    assert scalar is not None
    roots, reaches = _roots(scalar, grid, fluid._evaluate(prop, grid, "nan"), value)
    return Found(
        prop, value, "temperature", "mass", roots, (fluid,) * len(roots), (low, high), reaches,
        asked,
    )  # fmt: skip


def _by_composition(
    fluid: Mixture, prop: str, value: float, kelvin: float, vary: Any, between: Any, by: str,
    asked: units.Asked | None,
) -> Found:  # fmt: skip
    key = _component(fluid, vary)
    shares = fluid.fractions(by)
    others = {name: share for name, share in shares.items() if name != key}
    rest = fluid._composition.rest
    top = 1.0
    if rest and rest != key:
        top = shares[key] + shares[rest]
    low, high = (0.0, top) if between is None else _ends(between, "ratio", (0.0, top))

    def compose(share: Any) -> Mixture:
        filled = {key: share, **_fill_up(others, share, rest if rest != key else "", shares[key])}
        ordered = tuple(shares)
        mass = to_mass(ordered, [filled[name] + 0.0 * np.asarray(share) for name in ordered], by)
        if np.ndim(share) == 0:
            mass = tuple(float(w) for w in mass)
        return Mixture(
            Composition(ordered, mass, fluid.assumptions, rest),
            estimates=fluid._estimates,
            quiet=True,
        )

    fluid._evaluate(prop, kelvin, "nan")  # raises where the property cannot be had at all
    grid = np.linspace(low, high, POINTS)
    values = compose(grid)._evaluate(prop, np.asarray(kelvin), "nan")
    if not np.isfinite(values).any():
        # Nothing in range: let the policy say why, with the range.
        compose(grid)._evaluate(prop, np.asarray(kelvin), "raise")

    def scalar(share: float) -> float:
        return float(compose(float(share))._evaluate(prop, kelvin, "allow"))

    roots, reaches = _roots(scalar, grid, values, value)
    fluids = tuple(compose(root) for root in roots)
    return Found(prop, value, key, by, roots, fluids, (low, high), reaches, asked)


def _fill_up(others: Mapping[str, Any], share: Any, rest: str, before: float) -> dict[str, Any]:
    """The other components beside a varied share: the rest gives way, else all in proportion."""
    if rest:
        return {
            name: part + before - share if name == rest else part for name, part in others.items()
        }
    total = sum(others.values())
    if total == 0.0:
        raise CompositionError("There is nothing else in the mixture to make room")
    return {name: part / total * (1.0 - share) for name, part in others.items()}


def _component(fluid: Mixture, vary: Any) -> str:
    from dropkit.properties.other_chemicals import key_of

    key = key_of(vary)
    if key not in fluid.components:
        raise UnknownName(
            f"{vary!r} is no component of {fluid.name}",
            allowed=", ".join((*fluid.components, "temperature")),
            choices=nearest(str(vary), fluid.components),
        )
    return key


def _ends(between: Any, kind: str, allowed: tuple[float, float]) -> tuple[float, float]:
    try:
        first, second = between
    except (TypeError, ValueError) as problem:
        raise BadInput(f"between is {between!r}", allowed="a pair of ends") from problem
    warm = kind == "temperature"
    low = units.single(first, kind, "between", plausible=warm)
    high = units.single(second, kind, "between", plausible=warm)
    # Rounding of shares must not refuse an end that is meant.
    if abs(high - allowed[1]) < 1e-9:
        high = allowed[1]
    if not allowed[0] <= low < high <= allowed[1]:
        raise BadInput(
            f"between runs from {low:g} to {high:g}",
            allowed=f"rising, within {allowed[0]:g} to {allowed[1]:g}",
        )
    return low, high


def _roots(
    scalar: Callable[[float], float], grid: FloatArray, values: FloatArray, target: float
) -> tuple[tuple[float, ...], tuple[float, float]]:
    """All crossings of `target`, near-touching extremes included, and the span of the values."""
    from scipy.optimize import brentq, minimize_scalar

    known = np.isfinite(values)
    reaches = (float(np.nanmin(values)), float(np.nanmax(values)))
    miss = values - target
    roots = [float(grid[i]) for i in np.flatnonzero(known & (miss == 0.0))]

    def error(x: float) -> float:
        return scalar(x) - target

    crossing = known[:-1] & known[1:] & (miss[:-1] * miss[1:] < 0.0)
    brackets = [(float(grid[i]), float(grid[i + 1])) for i in np.flatnonzero(crossing)]
    # An extreme between grid points may reach the target though no grid point does.
    with np.errstate(invalid="ignore"):
        side = np.sign(miss)
        same = (side[:-2] == side[1:-1]) & (side[1:-1] == side[2:]) & (side[1:-1] != 0)
        closer = (np.abs(miss[1:-1]) <= np.abs(miss[:-2])) & (
            np.abs(miss[1:-1]) <= np.abs(miss[2:])
        )
    for i in np.flatnonzero(same & closer) + 1:
        sign = float(side[i])
        best = minimize_scalar(
            lambda x, sign=sign: sign * error(float(x)),
            bounds=(float(grid[i - 1]), float(grid[i + 1])),
            method="bounded",
            options={"xatol": 1e-12},
        )
        if best.fun < 0.0:
            brackets += [(float(grid[i - 1]), float(best.x)), (float(best.x), float(grid[i + 1]))]
    roots += [float(brentq(error, a, b, xtol=1e-12, rtol=1e-13)) for a, b in brackets]
    return tuple(sorted(roots)), reaches
