"""`choose`: which liquids have the properties that a job needs."""

from __future__ import annotations

import math
from collections.abc import Callable, Mapping, Sequence
from typing import TYPE_CHECKING, Any, Final, NamedTuple

from dropkit import units
from dropkit.errors import BadInput, RecalledWarning, UnknownName, nearest, warn_user
from dropkit.properties import display
from dropkit.properties.catalogue import family_names
from dropkit.properties.choice_criteria import (
    OPTIONS,
    QUANTITIES,
    Criterion,
    in_unit,
    kind_word,
    read_criteria,
    shown,
)
from dropkit.properties.equations import FORMS
from dropkit.properties.property_words import PROPERTIES, QUOTIENT
from dropkit.provenance import GRADES, Grade, worst_grade
from dropkit.records import fold, selection, summaries

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["Choosable", "Value", "choosable", "choose"]

CLOSEST: Final = 3
FLASH_NOTE: Final = (
    "flash points are those of the records, each by its own method; a mist or foam can burn below "
    "it, and a liquid whose record has none may burn all the same; the safety data sheet, local "
    "codes and licensed practice decide"
)


def choose(
    *,
    at: Any = None,
    family: str | Sequence[str] | None = None,
    grade: str | None = None,
    plausible: bool = True,
    **criteria: Any,
) -> pd.DataFrame:
    """The liquids that keep some ranges of properties, with values, uncertainties and grades.

    Holds for the pure liquids of dropkit's records in their stated ranges. Solutes are not
    offered, nor are liquids below their melting point.

    Parameters
    ----------
    at : temperature, optional
        Where properties are compared [K]; needed as soon as one is asked for.
    family : str or sequence of str, optional
        One family or several, as `dropkit.liquids` lists them.
    grade : {"reference", "measured", "own", "single", "recalled", "estimated"}, optional
        The worst grade that is accepted: of the properties asked for at that temperature;
        without any, of the liquid.
    plausible : bool
        Refuse limits that no liquid has, such as 25 K for 25 degC.
    **criteria
        ``viscosity=("2 mPa*s", "5 mPa*s")``: a range, its ends included, None for an open end;
        ``flash_point_above="60 degC"``, ``viscosity_below=0.005``: limits, themselves
        excluded. Of every property, and of flash_point, boiling_point, melting_point,
        critical_temperature and molar_mass. Bare numbers are SI.

    Returns
    -------
    pandas.DataFrame
        One row per liquid, by key, in rising order of the first criterion: name, cas, family,
        grade (the worst of the properties asked for; without any, the liquid's); for each
        property its value, its standard uncertainty (k = 1) and its grade, for each constant
        its value; ``note`` says what pressure a liquid needs above its boiling point. Values
        come in the trade's unit where the criterion carried a unit, else in SI, as the header
        says. Its ``attrs`` hold ``message`` (the answer in one line), ``criteria``,
        ``left_out`` (key to the reason why a liquid can't be judged), ``failed`` (how many
        liquids each criterion turned away), ``nearest`` (the three that came closest, with what
        they miss) and ``cautions``.

    Raises
    ------
    BadInput
        For an unknown criterion, for what is no range or limit, for a property without `at`,
        and without any criterion.
    UnknownName
        For an unknown family or grade.

    Notes
    -----
    A liquid that keeps every criterion that can be judged, but lacks a property or constant, or
    whose record doesn't hold that temperature, neither passes nor fails: it stands in
    ``attrs["left_out"]``, as do solids. Closest are those that miss the fewest criteria, then
    those that miss them by the smallest ratio (100 K count as a factor of e, a grade too).
    Values are those of `dropkit.liquid`.

    Examples
    --------
    >>> import dropkit as dk
    >>> found = dk.choose(viscosity=("2 mPa*s", "2.8 mPa*s"), at="20 degC", family="alcohol")
    >>> print(f"{found.loc['2-propanol', 'viscosity [mPa*s]']:.1f}")
    2.4
    >>> "mercury" in dk.choose(density_above=13000.0, at=293.15).index
    True
    """
    wanted = read_criteria(criteria, plausible=plausible)
    kin = None if family is None else _families(family)
    worst = _worst(grade)
    if not wanted and kin is None and worst is None:
        raise BadInput(
            "choose has nothing to choose by",
            allowed=f"{', '.join(QUANTITIES)}, {', '.join(OPTIONS[1:3])}",
            hint="dropkit.liquids() lists all",
        )
    quantities = tuple(dict.fromkeys(criterion.quantity for criterion in wanted))
    first = next((word for word in quantities if word in PROPERTIES), None)
    if first is not None and at is None:
        raise BadInput(
            f"choose needs at=, the temperature of {first}", allowed="such as at='20 degC'"
        )
    kelvin = None if at is None else units.single(at, "temperature", "at", plausible=plausible)
    choice = _Choice(choosable(), wanted, quantities, kelvin, worst)
    entries = summaries()
    for key in choice.table.held:
        if kin is None or entries[key]["family"] in kin:
            choice.judge(key, entries[key]["grade"])
    return choice.frame(entries)


def _families(family: Any) -> set[str]:
    names = [family] if isinstance(family, str) else family
    if not isinstance(names, (list, tuple, set, frozenset)) or not names:
        raise BadInput(f"family={family!r}", allowed="a family, or a sequence of families")
    held = family_names()
    known = {fold(name): name for name in held} | {fold(name) + "s": name for name in held}
    for name in names:
        if not isinstance(name, str) or fold(name) not in known:
            raise UnknownName(
                f"no family is called {name!r}",
                allowed=", ".join(held),
                choices=nearest(str(name), held),
            )
    return {known[fold(name)] for name in names}


def _worst(grade: Any) -> Grade | None:
    for known in GRADES:
        if grade == known:
            return known
    if grade is None:
        return None
    raise UnknownName(
        f"no grade is called {grade!r}",
        allowed=", ".join(GRADES),
        choices=nearest(str(grade), GRADES),
    )


# ------------------------------------------------ values
class Value(NamedTuple):
    """A property of a liquid at one temperature.

    Parameters
    ----------
    value, uncertainty : float
        Value and standard uncertainty [SI].
    grade : str
        Grade of the record that serves it.
    """

    value: float
    uncertainty: float
    grade: Grade


class Choosable:
    """The liquids to choose from: evaluates them from the generated table, as records would.

    Parameters
    ----------
    held : mapping
        What `dropkit.records.selection` gives.
    """

    def __init__(self, held: Mapping[str, Mapping[str, Any]]) -> None:
        self.held = held
        self._scalars: dict[tuple[str, str, int], Callable[[float], float]] = {}

    def look(self, key: str, prop: str, kelvin: float) -> Value | str:
        """A property at a temperature, or the reason why there is none."""
        if prop == "kinematic_viscosity":
            top, bottom = (self.look(key, part, kelvin) for part in QUOTIENT)
            if isinstance(top, str) or isinstance(bottom, str):
                return "; ".join(part for part in (top, bottom) if isinstance(part, str))
            value = top.value / bottom.value
            relative = math.hypot(top.uncertainty / top.value, bottom.uncertainty / bottom.value)
            return Value(value, relative * value, worst_grade([top.grade, bottom.grade]))
        blocks = self.held[key]["properties"].get(prop)
        if not blocks:
            return f"its record has no {prop}"
        for number, (form, parameters, low, high, relative, absolute, grade) in enumerate(blocks):
            if low <= kelvin <= high:
                place = (key, prop, number)
                scalar = self._scalars.get(place)
                if scalar is None:
                    scalar = self._scalars[place] = FORMS[form].scalar(parameters)
                value = scalar(kelvin)
                spread = relative * value
                return Value(value, spread if absolute is None else max(spread, absolute), grade)
        ends = (min(block[2] for block in blocks), max(block[3] for block in blocks))
        span = " to ".join(f"{end - 273.15:.4g}" for end in ends)
        return f"{prop} is known from {span} degC"

    def pressure_needed(self, key: str, kelvin: float) -> str:
        """What keeps a liquid from boiling, empty below its boiling point."""
        boils = self.held[key]["constants"].get("boiling_point")
        if boils is None or kelvin <= boils:
            return ""
        vapour = self.look(key, "vapour_pressure", kelvin)
        need = "" if isinstance(vapour, str) else f"p >= {vapour.value / 1e5:.3g} bar (absolute): "
        return f"needs {need or 'pressure: '}boils at {boils - 273.15:.1f} degC at 1 atm"


_known: Choosable | None = None


def choosable() -> Choosable:
    """The liquids of dropkit's data folder; its equations are compiled once."""
    global _known
    held = selection()
    known = _known
    if known is None or known.held is not held:
        known = _known = Choosable(held)
    return known


# ------------------------------------------------ judging
class _Miss(NamedTuple):
    """A liquid that does not pass: how many criteria it misses, how far, and what it has."""

    number: int
    distance: float
    key: str
    text: str


class _Choice:
    """One choice: judges liquid by liquid, then makes the table."""

    def __init__(
        self,
        table: Choosable,
        wanted: Sequence[Criterion],
        quantities: Sequence[str],
        kelvin: float | None,
        worst: Grade | None,
    ) -> None:
        self.table, self.wanted, self.quantities = table, wanted, quantities
        self.kelvin, self.worst = kelvin, worst
        self.passed: dict[str, tuple[dict[str, float], dict[str, Value]]] = {}
        self.left_out: dict[str, str] = {}
        self.missed: list[_Miss] = []
        self.judged = 0
        self.criteria = [str(criterion) for criterion in wanted]
        if worst is not None:
            self.criteria.append(f"grade at least {worst}")
        self.failed = dict.fromkeys(self.criteria, 0)

    def judge(self, key: str, overall: Grade | None) -> None:
        """Let a liquid pass, turn it away, or leave it out with the reason."""
        constants = self.table.held[key]["constants"]
        melts = constants.get("melting_point")
        if self.kelvin is not None and melts is not None and self.kelvin < melts:
            self.left_out[key] = f"solid: melts at {melts - 273.15:.1f} degC"
            return
        numbers: dict[str, float] = {}
        properties: dict[str, Value] = {}
        reasons = []
        for quantity in self.quantities:
            if quantity not in PROPERTIES:
                if quantity in constants:
                    numbers[quantity] = constants[quantity]
                else:
                    reasons.append(f"its record has no {quantity}")
                continue
            assert self.kelvin is not None
            found = self.table.look(key, quantity, self.kelvin)
            if isinstance(found, str):
                reasons.append(found)
            else:
                properties[quantity] = found
                numbers[quantity] = found.value
        grade = overall
        if any(quantity in PROPERTIES for quantity in self.quantities):
            grade = worst_grade(f.grade for f in properties.values()) if properties else None
        elif self.worst is not None and grade is None:
            reasons.append("it has no grade: density, viscosity or surface tension is missing")
        misses, distance = self._misses(numbers, grade)
        if reasons and not misses:
            self.left_out[key] = "; ".join(reasons)
            return
        self.judged += 1
        if not misses:
            self.passed[key] = (numbers, properties)
        elif not reasons:
            self.missed.append(_Miss(len(misses), distance, key, "; ".join(misses)))

    def _misses(self, numbers: Mapping[str, float], grade: Grade | None) -> tuple[list[str], float]:
        """What a liquid misses, in words, and by how much together."""
        misses, distance = [], 0.0
        for criterion, text in zip(self.wanted, self.criteria, strict=False):
            value = numbers.get(criterion.quantity)
            if value is not None and not criterion.holds(value):
                distance += criterion.miss(value)
                has = shown(criterion.quantity, value)
                misses.append(f"{criterion.quantity} {has}, wanted {criterion.limits}")
                self.failed[text] += 1
        if self.worst is not None and grade is not None:
            steps = GRADES.index(grade) - GRADES.index(self.worst)
            if steps > 0:
                distance += steps
                misses.append(f"grade {grade}, wanted at least {self.worst}")
                self.failed[self.criteria[-1]] += 1
        return misses, distance

    def message(self) -> str:
        """The answer in one line."""
        where = "" if self.kelvin is None else f" at {shown('boiling_point', self.kelvin)}"
        text = f"{len(self.passed)} of {self.judged} liquids{where}"
        if self.left_out:
            text += f"; {len(self.left_out)} more left out, see left_out"
        if not self.passed and any(self.failed.values()):
            word = max(self.failed, key=lambda criterion: self.failed[criterion])
            text += f"; {word} turned away {self.failed[word]}"
        return text

    def frame(self, entries: Mapping[str, Mapping[str, Any]]) -> pd.DataFrame:
        """The table with its attributes."""
        import pandas as pd

        keys = sorted(self.passed)
        if self.quantities:
            keys.sort(key=lambda key: self.passed[key][0][self.quantities[0]])
        columns: dict[str, Any] = {
            name: [entries[key][name] for key in keys] for name in ("name", "cas", "family")
        }
        columns["grade"] = [
            worst_grade(found.grade for found in self.passed[key][1].values())
            if self.passed[key][1]
            else entries[key]["grade"]
            for key in keys
        ]
        for quantity in self.quantities:
            columns |= self._columns(quantity, keys)
        if self.kelvin is not None:
            columns["note"] = [self.table.pressure_needed(key, self.kelvin) for key in keys]
        frame = pd.DataFrame(columns, index=pd.Index(keys, name="key", dtype=object))
        if not keys:  # columns of text, though there is none to tell by
            text = [name for name, values in columns.items() if isinstance(values, list)]
            frame = frame.astype(dict.fromkeys(text, object))
        frame.attrs = {
            "message": self.message(),
            "criteria": self.criteria,
            "left_out": self.left_out,
            "failed": self.failed,
            "nearest": {miss.key: miss.text for miss in sorted(self.missed)[:CLOSEST]},
            "cautions": [FLASH_NOTE] if "flash_point" in self.quantities else [],
        }
        self._warn_if_recalled(keys)
        return frame

    def _columns(self, quantity: str, keys: Sequence[str]) -> dict[str, Any]:
        """Value, and where there are any uncertainty and grade, of a quantity."""
        import numpy as np

        with_units = any(c.with_units for c in self.wanted if c.quantity == quantity)
        unit = f"[{display.unit_of(kind_word(quantity), with_units=with_units)}]"

        def column(values: Sequence[float]) -> Any:
            converted = [in_unit(quantity, value, with_units=with_units) for value in values]
            return np.array(converted, dtype=float)

        found: dict[str, Any] = {
            f"{quantity} {unit}": column([self.passed[key][0][quantity] for key in keys])
        }
        if quantity in PROPERTIES:
            values = [self.passed[key][1][quantity] for key in keys]
            found[f"u({quantity}) {unit}"] = column([value.uncertainty for value in values])
            found[f"{quantity} grade"] = [value.grade for value in values]
        if quantity == "flash_point":
            found["flash_point method"] = [self.table.held[key]["method"] for key in keys]
        return found

    def _warn_if_recalled(self, keys: Sequence[str]) -> None:
        used = [
            key
            for key in keys
            if any(found.grade == "recalled" for found in self.passed[key][1].values())
        ]
        if used:
            warn_user(
                f"values of {', '.join(used)} rest on memory (grade 'recalled'): uncertain by 5 % "
                "at least; grade='single' leaves them out",
                RecalledWarning,
            )
