"""The frozen records that data files turn into."""

from __future__ import annotations

from collections.abc import Iterator, Mapping
from dataclasses import dataclass
from typing import Any, Final

from dropkit.provenance import Grade, worst_grade
from dropkit.validity import Range

__all__ = [
    "INTERFACIAL",
    "LEADING",
    "PROPERTIES",
    "LiquidRecord",
    "PairRecord",
    "PropertyRecord",
    "Table",
    "ThickenerRecord",
]

# Properties that a record can hold, in the order in which they are shown.
PROPERTIES: Final[tuple[str, ...]] = (
    "density",
    "viscosity",
    "surface_tension",
    "vapour_pressure",
    "heat_of_vaporisation",
    "heat_capacity",
    "thermal_conductivity",
    "static_permittivity",
    "speed_of_sound",
    "diffusivity_in_air",
    "refractive_index",
    "electrical_conductivity",
)
# A liquid's grade is its worst grade of these.
LEADING: Final = PROPERTIES[:3]
# The one property of two liquids in contact.
INTERFACIAL: Final = "interfacial_tension"


class Table(Mapping[str, Any]):
    """A read-only table of a data file: lists are tuples, sub-tables are tables.

    Unlike a mapping proxy it can be pickled, compared and hashed, so records can.
    """

    __slots__ = ("_items",)

    def __init__(self, items: Mapping[str, Any]) -> None:
        self._items = {key: _frozen(value) for key, value in items.items()}

    def __getitem__(self, key: str) -> Any:
        return self._items[key]

    def __iter__(self) -> Iterator[str]:
        return iter(self._items)

    def __len__(self) -> int:
        return len(self._items)

    def __hash__(self) -> int:
        return hash(frozenset(self._items.items()))

    def __repr__(self) -> str:
        return repr(self._items)

    def __reduce__(self) -> tuple[object, ...]:
        return (Table, (self._items,))


def _frozen(value: Any) -> Any:
    if isinstance(value, Mapping):
        return Table(value)
    if isinstance(value, (list, tuple)):
        return tuple(map(_frozen, value))
    return value


@dataclass(frozen=True, slots=True)
class PropertyRecord:
    """One equation for one property, with everything that defends it.

    Parameters
    ----------
    property : str
        What it gives, such as ``"viscosity"``.
    label : str
        Where it stands, such as ``"liquids/glycerol: viscosity 1"``.
    form : str
        The equation form.
    parameters : mapping
        Every key of the block that belongs to the equation.
    range : Range
        Temperatures [K] in which it holds.
    mixture_range : Range or None
        A wider range that may be used inside mixtures only.
    uncertainty : float
        Relative standard uncertainty (k = 1); where the block states an absolute one, that
        one over the value of the first check point.
    uncertainty_absolute : float or None
        Absolute standard uncertainty [SI] where the block states one.
    grade : Grade
        How far it can be trusted.
    sources : tuple of str
        Keys of the sources that it was taken from or fitted to.
    place : str
        Table, equation or page within the source.
    obtained : str
        ``"as published"`` or how it was fitted.
    second : mapping or None
        The independent check: source, points, median, worst (relative).
    left_out : mapping or None
        The error on data that the fit did not see: how, median, p95 (relative).
    checks : tuple of mapping
        Published points that the equation must give: T, value, source, place, tolerance.
    cautions : tuple of str
        Shown with every value.
    points : tuple of str
        Published files, without ``.csv``, that a plot shows.
    reasons : mapping of str to str
        What the block says about itself: ``note``, ``reason`` and every ``..._reason``.
    """

    property: str
    label: str
    form: str
    parameters: Mapping[str, Any]
    range: Range
    mixture_range: Range | None
    uncertainty: float
    uncertainty_absolute: float | None
    grade: Grade
    sources: tuple[str, ...]
    place: str
    obtained: str
    second: Mapping[str, Any] | None
    left_out: Mapping[str, Any] | None
    checks: tuple[Mapping[str, Any], ...]
    cautions: tuple[str, ...]
    points: tuple[str, ...]
    reasons: Mapping[str, str] = Table({})


@dataclass(frozen=True, slots=True)
class LiquidRecord:
    """All that dropkit holds on one liquid or solute.

    Parameters
    ----------
    key : str
        Name of its file.
    name, cas, formula, family : str
        Shown name, CAS number, formula, chemical family.
    kind : str
        ``"liquid"`` or ``"solute"``.
    amphiphile : bool
        Whether it gathers at the surface of water.
    synonyms : tuple of str
        Other names.
    molar_mass : float
        [kg/mol].
    melting_point, boiling_point, critical_temperature : float or None
        [K], at 101325 Pa.
    facts : mapping
        Every sub-table of the file that is no property, with its source.
    cautions : tuple of str
        Shown with every state.
    properties : mapping
        Property to its records in order of preference.
    """

    key: str
    name: str
    cas: str
    formula: str
    family: str
    kind: str
    amphiphile: bool
    synonyms: tuple[str, ...]
    molar_mass: float
    melting_point: float | None
    boiling_point: float | None
    critical_temperature: float | None
    facts: Mapping[str, Any]
    cautions: tuple[str, ...]
    properties: Mapping[str, tuple[PropertyRecord, ...]]

    @property
    def grade(self) -> Grade | None:
        """The worst grade of density, viscosity and surface tension; None where one is missing."""
        if any(name not in self.properties for name in LEADING):
            return None
        return worst_grade(block.grade for name in LEADING for block in self.properties[name])


@dataclass(frozen=True, slots=True)
class PairRecord:
    """All that dropkit holds on a pair: a mixture of two, or two liquids in contact.

    Parameters
    ----------
    components : tuple of str
        Keys, alphabetical; component 1 of every equation is the first.
    properties : mapping
        Property to its records in order of preference.
    """

    components: tuple[str, str]
    properties: Mapping[str, tuple[PropertyRecord, ...]]


@dataclass(frozen=True, slots=True)
class ThickenerRecord:
    """All that dropkit holds on one dissolved polymer: what it does to a viscosity.

    Parameters
    ----------
    key : str
        Name of its file.
    name, cas : str
        Shown name, CAS number.
    charge : str
        ``"neutral"``, or ``"anionic"``: then its size depends on the salt beside it.
    surface_active : bool
        Whether it is taken to change the surface tension.
    surface_reason : str
        Why.
    synonyms, cautions : tuple of str
        Other names; shown with every solution.
    properties : mapping
        ``intrinsic_viscosity`` to its entries, each of one material and solvent.
    """

    key: str
    name: str
    cas: str
    charge: str
    surface_active: bool
    surface_reason: str
    synonyms: tuple[str, ...]
    cautions: tuple[str, ...]
    properties: Mapping[str, tuple[PropertyRecord, ...]]
