"""From what a user writes for a composition to mass fractions, once, with every slip named."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass, replace
from typing import Any, Final

import numpy as np

from dropkit import records, units
from dropkit.errors import BadInput, BasisMissing, CompositionError, UnitError
from dropkit.properties.curves import Curve
from dropkit.properties.other_chemicals import awake, key_of

__all__ = [
    "BASES",
    "Composition",
    "awoken",
    "from_mass",
    "read_composition",
    "reference_density",
    "to_mass",
]

BASES: Final = ("mass", "mole", "volume")
# Amounts of these kinds fix the basis; percentages and bare numbers are fractions.
_AMOUNTS: Final = (("mass", "mass"), ("volume", "volume"), ("amount", "mole"))
EXACT, NEAR = 1e-6, 2e-3


@dataclass(frozen=True, slots=True)
class Composition:
    """Mass fractions of named components.

    Parameters
    ----------
    keys : tuple of str
        Record keys, in the user's order.
    fractions : tuple of float or ndarray
        Mass fractions, all of one shape.
    assumptions : tuple of str
        What was taken for granted in reading it.
    rest : str
        Key of the component that was given as ``"rest"``; empty if none was.
    """

    keys: tuple[str, ...]
    fractions: tuple[Any, ...]
    assumptions: tuple[str, ...] = ()
    rest: str = ""

    @property
    def shape(self) -> tuple[int, ...]:
        """() for one composition, else the shape of the arrays."""
        return np.shape(self.fractions[0])


def awoken(composition: Composition) -> Composition:
    """One that was pickled, with the records of its components to be found here."""
    keys = tuple(map(awake, composition.keys))
    if keys == composition.keys:
        return composition
    return replace(composition, keys=keys, rest=awake(composition.rest))


def reference_density(key: str, temperature: float = 293.15) -> float:
    """Density [kg/m3] of a pure liquid at the temperature at which volumes count."""
    record = records.liquid_record(key)
    if record.kind != "liquid":
        raise CompositionError(
            f"{record.name} is a solid and has no volume as a liquid",
            hint="Give it by mass or by mole",
        )
    if "density" not in record.properties:
        raise CompositionError(
            f"{record.name} has no density record, so volumes can't be converted"
        )
    curve = Curve(record.properties["density"], inside_mixtures=True)
    if not curve.range.low <= temperature <= curve.range.high:
        raise CompositionError(
            f"{record.name} has no density at {temperature:g} K, where volumes were measured",
            allowed=str(curve.range),
        )
    return curve.scalar(temperature)


def _per_mass(key: str, basis: str, measured_at: float) -> float:
    """Amount on a basis per kilogram: 1, mol or m3."""
    if basis == "mass":
        return 1.0
    if basis == "mole":
        return 1.0 / records.liquid_record(key).molar_mass
    return 1.0 / reference_density(key, measured_at)


def to_mass(
    keys: Sequence[str], fractions: Sequence[Any], basis: str, measured_at: float = 293.15
) -> tuple[Any, ...]:
    """Mass fractions from amounts or fractions on any basis; normalised."""
    if basis == "mass":
        total = sum(fractions[1:], start=fractions[0])
        return tuple(value / total for value in fractions)
    masses = [
        value / _per_mass(key, basis, measured_at)
        for key, value in zip(keys, fractions, strict=True)
    ]
    total = sum(masses)
    return tuple(mass / total for mass in masses)


def from_mass(
    keys: Sequence[str], fractions: Sequence[Any], basis: str, measured_at: float = 293.15
) -> tuple[Any, ...]:
    """Fractions on any basis from mass fractions; by volume means volumes before mixing."""
    amounts = [
        value * _per_mass(key, basis, measured_at)
        for key, value in zip(keys, fractions, strict=True)
    ]
    total = sum(amounts)
    return tuple(amount / total for amount in amounts)


def check_basis(by: Any) -> str:
    """`by` if it is a basis; else an error that lists them."""
    if isinstance(by, str) and by in BASES:
        return by
    raise CompositionError(f"by={by!r} is no basis", allowed='by="mass", by="mole" or by="volume"')


def read_composition(
    components: Mapping[str, Any],
    *,
    by: str | None = None,
    normalise: bool = False,
    measured_at: Any = 293.15,
) -> Composition:
    """Read a composition as a user writes it.

    Parameters
    ----------
    components : mapping of str to amount, fraction or "rest"
        All amounts with units, or all fractions.
    by : {"mass", "mole", "volume"}, optional
        Basis of bare fractions and of percentages.
    normalise : bool
        Accept fractions whose sum misses 1 by up to 0.002.
    measured_at : temperature
        Where volumes before mixing were measured [K]; 20 degC by default.

    Raises
    ------
    CompositionError, BasisMissing, UnknownName, UnitError, BadInput
        Each says what is allowed.
    """
    if not isinstance(components, Mapping):
        raise BadInput(
            f"A composition is a mapping of names to amounts, not {type(components).__name__}",
            allowed="such as {'glycerol': 0.38, 'water': 'rest'}",
        )
    if not components:
        raise CompositionError("The composition is empty", allowed="at least one component")
    if by is not None:
        check_basis(by)
    names = [_key(name) for name in components]
    for position, key in enumerate(names):
        if key in names[:position]:
            raise CompositionError(f"{key} appears twice, under two of its names")
    values: list[Any] = []
    kinds: set[str] = set()
    rest = ""
    for key, value in zip(names, components.values(), strict=True):
        if isinstance(value, str) and value.strip().casefold() == "rest":
            if rest:
                raise CompositionError(
                    f"Both {rest} and {key} are 'rest'", allowed="one component as 'rest'"
                )
            rest = key
            values.append(None)
            continue
        number, kind = _read_amount(key, value)
        values.append(number)
        kinds.add(kind)
    if len(kinds) > 1:
        raise CompositionError(
            f"The amounts are of different kinds: {', '.join(sorted(kinds))}",
            allowed="all by mass, all by volume, all by amount of substance, or all fractions",
        )
    kind = kinds.pop() if kinds else "fraction"
    basis, from_unit = _basis(kind, by)
    assumptions: list[str] = []
    kelvin = units.single(measured_at, "temperature", "measured_at", plausible=True)
    if basis == "volume":
        assumptions.append(f"volumes before mixing, measured at {kelvin - 273.15:g} degC")
    if from_unit and rest:
        raise CompositionError(
            f"'rest' for {rest} needs fractions, but amounts are given",
            hint="Give the amount of every component, or fractions with by=",
        )
    if from_unit:
        fractions = _check_amounts(names, values)
    else:
        fractions = _complete(names, values, rest, normalise)
    if len(names) == 1 and rest:
        fractions = [1.0]
    # Fractions by mass with a rest add up to one as they are.
    done = basis == "mass" and bool(rest)
    mass = tuple(fractions) if done else to_mass(names, fractions, basis, kelvin)
    shape = np.broadcast_shapes(*(np.shape(value) for value in mass))
    if shape:
        # A copy of what the user gave, and nobody else writes into it either.
        mass = tuple(np.array(np.broadcast_to(value, shape), dtype=float) for value in mass)
        for value in mass:
            value.flags.writeable = False
    else:
        mass = tuple(float(value) for value in mass)
    return Composition(tuple(names), mass, tuple(assumptions), rest)


def _key(name: Any) -> str:
    key = getattr(name, "key", name)
    if not isinstance(key, str):
        raise BadInput(
            f"A component is named by text or is a liquid of dropkit, not {type(name).__name__}",
            hint="A fluid of your own has no composition data; use with_values() on a mixture",
        )
    return key_of(key)


def _read_amount(key: str, value: Any) -> tuple[Any, str]:
    """Number in SI and kind: a basis for amounts, "fraction", or "mass fraction" and so on."""
    if isinstance(value, bool | np.bool_) or value is None:
        raise BadInput(f"The amount of {key} is {value!r}", allowed="a number, amount or 'rest'")
    carries_unit = isinstance(value, str | tuple) or hasattr(value, "magnitude")
    if isinstance(value, list) and value and isinstance(value[0], str):
        carries_unit = True
    if not carries_unit:
        number, _ = units.read(value, "ratio", f"fraction of {key}", domain="any")
        return _plain(number), "fraction"
    for kind, basis in _AMOUNTS:
        try:
            number, _ = units.read(value, kind, f"amount of {key}", domain="any")
        except UnitError:
            continue
        return _plain(number), basis
    if key != "sucrose" and "bx" in str(value).casefold():
        raise CompositionError(
            f"{value!r} of {key}: degrees Brix are per cent of sucrose",
            hint="A refractometer's reading of something else is not its fraction; "
            "find(refractive_index=...) turns it into one",
        )
    fits = {}
    for basis in BASES:
        try:
            fits[basis], _ = units.read(value, f"{basis}_fraction", f"fraction of {key}")
        except UnitError:
            continue
    if len(fits) == len(BASES):
        return _plain(fits["mass"]), "fraction"
    if len(fits) == 1:
        ((basis, number),) = fits.items()
        return _plain(number), f"{basis} fraction"
    raise UnitError(
        f"{value!r} is no amount of {key}",
        allowed="a mass ('62 g'), volume ('250 mL'), amount ('2 mol'), '38 %' with by=, "
        "a bare fraction with by=, or 'rest'",
    )


def _plain(number: Any) -> Any:
    return number.to_numpy(dtype=float) if hasattr(number, "to_numpy") else number


def _basis(kind: str, by: str | None) -> tuple[str, bool]:
    """The basis, and whether amounts (rather than fractions) are given."""
    if kind in ("mass", "volume", "mole"):
        if by is not None and by != kind:
            raise CompositionError(
                f"by={by!r} contradicts the amounts, which are by {kind}",
                hint="Leave by= out: amounts with units fix the basis",
            )
        return kind, True
    if kind.endswith(" fraction"):
        basis = kind.removesuffix(" fraction")
        if by not in (None, basis):
            raise CompositionError(f"by={by!r} contradicts the percentages, which are by {basis}")
        return basis, False
    if by is None:
        raise BasisMissing(
            "Fractions without a basis",
            allowed='by="mass", by="mole" or by="volume"',
            hint="A mole fraction of 0.1 can be a mass fraction of 0.4: there is no default",
        )
    return by, False


def _check_each(names: Sequence[str], values: Sequence[Any], what: str) -> None:
    for key, value in zip(names, values, strict=True):
        if value is None:
            continue
        array = np.asarray(value, dtype=float)
        if array.size and array.min() >= 0.0 and array.max() < np.inf:
            continue  # NaN fails both
        if np.isnan(array).any():
            raise CompositionError(f"The {what} of {key} is NaN", allowed="finite numbers >= 0")
        if np.isinf(array).any() or (array < 0).any():
            worst = float(array.min()) if (array < 0).any() else float("inf")
            raise CompositionError(
                f"The {what} of {key} is {worst:g}", allowed="finite numbers >= 0"
            )


def _check_amounts(names: Sequence[str], values: Sequence[Any]) -> list[Any]:
    _check_each(names, values, "amount")
    try:
        total = sum(values)
    except ValueError as problem:
        raise CompositionError("The amounts have shapes that don't fit together") from problem
    if np.any(np.asarray(total) <= 0):
        raise CompositionError("All amounts are zero", allowed="at least one above zero")
    return list(values)


def _complete(names: Sequence[str], values: Sequence[Any], rest: str, normalise: bool) -> list[Any]:
    """Fractions that add up to one, with the rest filled in."""
    _check_each(names, values, "fraction")
    given = [value for value in values if value is not None]
    try:
        total = np.asarray(sum(given[1:], start=given[0]) if given else 0.0, dtype=float)
    except ValueError as problem:
        raise CompositionError("The fractions have shapes that don't fit together") from problem
    percent = _looks_like_percent(total, rest)
    if rest:
        if total.size and total.max() > 1.0 + EXACT:
            raise CompositionError(
                f"The fractions without the rest add up to {_where(total, total.max())}",
                allowed="at most 1",
                hint=percent,
            )
        share = 1.0 - total
        if share.size and share.min() < 0.0:
            share = np.maximum(share, 0.0)
        remainder: Any = share if share.ndim else float(share)
        return [remainder if value is None else value for value in values]
    miss = np.abs(total - 1.0)
    if (miss > EXACT).any():
        worst = total.reshape(-1)[int(miss.argmax())]
        near = bool((miss <= NEAR).all())
        if not (near and normalise):
            hint = percent or (
                "normalise=True scales them to 1"
                if near
                else "Give one component as 'rest', or amounts with units, which are normalised"
            )
            raise CompositionError(
                f"The fractions add up to {_where(total, worst)}",
                allowed=f"1 within {EXACT:g}",
                hint=hint,
            )
    return list(values)


def _looks_like_percent(total: Any, rest: str) -> str:
    high = float(total.max()) if total.size else 0.0
    if 99.0 <= high <= 101.0 or (rest and 1.5 < high <= 100.0):
        return "That looks like percent: divide by 100, or write '38 %'"
    return ""


def _where(total: Any, value: Any) -> str:
    if total.ndim == 0:
        return f"{float(value):.6g}"
    return f"{float(value):.6g} (worst of {total.size})"
