"""`State`: the frozen numbers of one fluid at one condition, all that the upper layers need."""

from __future__ import annotations

from collections.abc import Iterator
from typing import TYPE_CHECKING, Any

import numpy as np

from dropkit import units
from dropkit.errors import BadInput, MissingProperty
from dropkit.properties import display
from dropkit.properties.interface import Fluid
from dropkit.properties.jsonable import from_plain, frozen, to_plain
from dropkit.properties.property_attributes import PropertyAttributes
from dropkit.properties.property_words import GRADED, PROPERTIES, property_name
from dropkit.properties.traced import Traced
from dropkit.provenance import Trail
from dropkit.validity import Outside

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["State"]

TABLE_COLUMNS = [
    "property", "value", "unit", "uncertainty", "uncertainty_95", "grade", "method", "sources",
    "range",
]  # fmt: skip


class State(PropertyAttributes, Traced):
    """Frozen properties of a fluid at one temperature or an array of temperatures.

    Made by ``fluid.at(temperature)``. Each property is an attribute, computed on first
    access and then kept; one that the fluid lacks raises MissingProperty at access.
    A state asked for with a unit gives Quantities, one asked for in SI gives SI;
    `si` and `with_units` turn it over.

    Parameters
    ----------
    fluid : Fluid
        The liquid, mixture or user's fluid.
    temperature : float or ndarray
        Temperature [K].
    asked : Asked, optional
        How it was asked: None for SI, else Quantities in the registry of who asked.
    outside : {"raise", "warn", "nan", "allow"}
        The range policy.
    name : str
        What to call it where there is no fluid.

    Examples
    --------
    >>> import dropkit as dk
    >>> state = dk.liquid("water").at("20 degC")
    >>> round(state.si().density, 1)
    998.2
    """

    def __init__(
        self,
        fluid: Fluid | None,
        temperature: Any,
        *,
        asked: units.Asked | None = None,
        outside: Outside = "raise",
        name: str = "",
    ) -> None:
        self._fluid = fluid
        self._temperature = frozen(temperature)
        self._asked = asked
        self._outside = outside
        self.name = fluid.name if fluid is not None else name
        self._values: dict[str, Any] = {}
        self._trails: dict[str, Trail] = {}
        self._reasons: dict[str, str] = {}
        self._cautions: tuple[str, ...] | None = None

    def __getstate__(self) -> dict[str, Any]:
        # Pickled whole: every number and trail, so that it needs no record where it arrives.
        reasons = {}
        for prop, _, trail, reason in self._given():
            if trail is None:
                reasons[prop] = reason
        cautions = self.cautions
        return {**self.__dict__, "_fluid": None, "_reasons": reasons, "_cautions": cautions}

    def __eq__(self, other: object) -> bool:
        return isinstance(other, State) and other.to_dict() == self.to_dict()

    # ------------------------------------------------ how it was asked
    def si(self) -> State:
        """The same state giving SI floats and arrays.

        Returns
        -------
        State
            What was computed is shared.

        Examples
        --------
        >>> import dropkit as dk
        >>> round(dk.liquid("water").at("20 degC").si().surface_tension, 4)
        0.0727
        """
        return self._turned(None)

    def with_units(self) -> State:
        """The same state giving Quantities.

        Returns
        -------
        State
            What was computed is shared.

        Examples
        --------
        >>> import dropkit as dk
        >>> print(f"{dk.liquid('water').at(293.15).with_units().surface_tension:.2f}")
        72.74 millinewton / meter
        """
        return self._turned(self._asked or units.Asked())

    def _turned(self, asked: units.Asked | None) -> State:
        twin = State(
            self._fluid,
            self._temperature,
            asked=asked,
            outside=self._outside,
            name=self.name,
        )
        twin._values, twin._trails = self._values, self._trails
        twin._reasons, twin._cautions = self._reasons, self._cautions
        return twin

    def _give(self, kind: str, value: Any) -> Any:
        return units.give(value, kind, self._asked)

    # ------------------------------------------------ values
    def _si(self, prop: str) -> Any:
        if prop not in self._values:
            if self._fluid is None:
                raise MissingProperty(
                    f"{self.name} has no {prop}", allowed="it has " + ", ".join(self.available())
                )
            value = self._fluid._evaluate(prop, self._temperature, self._outside)
            if isinstance(value, np.ndarray):
                value.flags.writeable = False
            self._values[prop] = value
        return self._values[prop]

    def _property(self, prop: str) -> Any:
        if self._fluid is not None:
            self._fluid._warn_if_recalled(prop)
        return self._give(prop, self._si(prop))

    @property
    def temperature(self) -> Any:
        """Temperature [K]."""
        return self._give("temperature", self._temperature)

    # ------------------------------------------------ what it rests on
    def available(self) -> tuple[str, ...]:
        """Names of the properties that can be asked.

        Returns
        -------
        tuple of str
            In the order of tables.
        """
        if self._fluid is not None:
            return self._fluid.available()
        return tuple(prop for prop in PROPERTIES if prop in self._values)

    def trail(self, prop: str) -> Trail:
        """How a property was made: records, methods, grade, ranges, cautions.

        Parameters
        ----------
        prop : str
            A property such as ``"viscosity"``.

        Returns
        -------
        Trail
            At this temperature.

        Raises
        ------
        UnknownName, MissingProperty
            No property is called so; it is not known here.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.liquid("water").at("20 degC").trail("density").sources
        ('IAPWS1995',)
        """
        property_name(prop)
        if prop not in self._trails:
            if self._fluid is None or prop not in self._fluid.available():
                self._si(prop)  # raises, naming what there is
            assert self._fluid is not None
            self._trails[prop] = self._fluid._trail(prop, self._temperature)
        return self._trails[prop]

    @property
    def cautions(self) -> tuple[str, ...]:
        """What to know before use: of the fluid, and of this temperature."""
        if self._cautions is None:
            texts = list(self._fluid.cautions) if self._fluid is not None else []
            for prop in GRADED:
                if prop in self.available():
                    texts += self.trail(prop).cautions
            self._cautions = tuple(dict.fromkeys(texts))
        return self._cautions

    def _given(self) -> Iterator[tuple[str, Any, Trail | None, str]]:
        """Property, value [SI], trail, and the reason where it can't be given here."""
        for prop in PROPERTIES:
            if prop in self._reasons:
                yield prop, float("nan"), None, self._reasons[prop]
            if prop not in self.available():
                if prop in GRADED and self._fluid is not None:
                    yield prop, float("nan"), None, str(self._fluid._missing(prop))
                continue
            try:
                yield prop, self._si(prop), self.trail(prop), ""
            except (ValueError, LookupError) as problem:
                yield prop, float("nan"), None, str(problem)

    @property
    def assumptions(self) -> tuple[str, ...]:
        """What was taken for granted in any property."""
        texts = (text for _, _, trail, _ in self._given() if trail for text in trail.assumptions)
        return tuple(dict.fromkeys(texts))

    @property
    def sources(self) -> tuple[str, ...]:
        """Keys of the sources that the properties rest on."""
        keys = (key for _, _, trail, _ in self._given() if trail for key in trail.sources)
        return tuple(dict.fromkeys(keys))

    # ------------------------------------------------ upper layers
    def numbers(self, length: Any, velocity: Any = None, **surroundings: Any) -> Any:
        """The table of all dimensionless numbers that can be formed.

        Parameters
        ----------
        length : float, array or with a unit
            Diameter of the jet, nozzle or drop [m].
        velocity : float, array or with a unit, optional
            Velocity of the liquid [m/s].
        **surroundings
            As `dropkit.numbers.numbers_sheet` takes them: gas, frequency and so on.

        Returns
        -------
        NumbersSheet
            Each number with what it compares and the limits that the trade quotes.

        Raises
        ------
        BadInput, UnknownName
            A length or velocity that is none; surroundings that no number takes.

        Examples
        --------
        >>> import dropkit as dk
        >>> sheet = dk.liquid("water").at("20 degC").numbers("50 um", "6 m/s")
        >>> round(sheet["weber"], 1)
        24.7
        """
        # The one stated exception to the order of the layers: see DEVELOPERS.md.
        from dropkit.numbers.sheet import numbers_sheet

        return numbers_sheet(self, length, velocity, **surroundings)

    # ------------------------------------------------ tables, dicts, display
    def table(self, *, estimates: bool = True) -> pd.DataFrame:
        """Every property with unit, uncertainty, method, grade, source and range.

        Parameters
        ----------
        estimates : bool
            False leaves properties of grade "estimated" out.

        Returns
        -------
        pandas.DataFrame
            One row per property, indexed by its name; for arrays, the value column
            holds one array per row. `uncertainty` is relative, k = 1; `uncertainty_95`
            is in the unit of the value. Properties that cannot be given here stand
            with NaN and the reason.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.liquid("water").at("20 degC").table().loc["viscosity", "unit"]
        'mPa*s'
        """
        import pandas as pd

        rows = []
        for prop, value, trail, reason in self._given():
            if trail is None:
                rows.append({"property": prop, "value": value, "grade": "", "method": reason})
                continue
            if trail.grade == "estimated" and not estimates:
                continue
            shown = display.in_stock(prop, value) if self._asked is not None else value
            spread = trail.uncertainty
            rows.append(
                {
                    "property": prop,
                    "value": shown,
                    "unit": display.unit_of(prop, with_units=self._asked is not None),
                    "uncertainty": float("nan") if spread is None else spread,
                    "uncertainty_95": float("nan") if spread is None else 2.0 * spread * shown,
                    "grade": trail.grade,
                    "method": trail.method,
                    "sources": ", ".join(trail.sources),
                    "range": trail.range,
                }
            )
        return pd.DataFrame(rows, columns=TABLE_COLUMNS).set_index("property")

    def to_dict(self) -> dict[str, Any]:
        """A dict of plain types that survives JSON; `from_dict` rebuilds the state.

        Returns
        -------
        dict
            Values [SI], trails, reasons and cautions.

        Examples
        --------
        >>> import dropkit as dk
        >>> state = dk.liquid("water").at("20 degC")
        >>> type(state).from_dict(state.to_dict()) == state
        True
        """
        values, trails, reasons = {}, {}, {}
        for prop, value, trail, reason in self._given():
            if trail is None:
                reasons[prop] = reason
            else:
                values[prop] = to_plain(value)
                trails[prop] = trail.to_dict()
        return {
            "kind": "State",
            "name": self.name,
            "temperature": to_plain(self._temperature),
            "with_units": self._asked is not None,
            "values": values,
            "trails": trails,
            "reasons": reasons,
            "cautions": list(self.cautions),
        }

    @classmethod
    def from_dict(cls, data: dict[str, Any]) -> State:
        """Rebuild a state from `to_dict`; it keeps its numbers and trails, not its fluid.

        Parameters
        ----------
        data : dict
            What `to_dict` gave, also after a passage through JSON.

        Returns
        -------
        State
            In SI or with units, as it was.

        Raises
        ------
        BadInput
            The dict of something else.
        """
        needed = {"name", "temperature", "with_units", "values", "trails", "reasons", "cautions"}
        if not isinstance(data, dict) or data.get("kind") != "State" or not needed <= data.keys():
            raise BadInput("This is no dict of a State", allowed="what State.to_dict() gave")
        state = cls(
            None,
            from_plain(data["temperature"]),
            asked=units.Asked() if data["with_units"] else None,
            name=data["name"],
        )
        state._values = {prop: from_plain(value) for prop, value in data["values"].items()}
        state._trails = {prop: Trail.from_dict(entry) for prop, entry in data["trails"].items()}
        state._reasons = dict(data["reasons"])
        state._cautions = tuple(data["cautions"])
        return state

    def _rows(self) -> list[tuple[str, ...]]:
        rows = []
        for prop, value, trail, reason in self._given():
            shown = display.in_stock(prop, value) if self._asked is not None else value
            unit = display.unit_of(prop, with_units=self._asked is not None)
            rows.append(display.sheet_row(prop, display.number(shown), unit, trail, reason))
        return rows

    @property
    def _title(self) -> str:
        kelvin = display.number(self._temperature, 6)
        celsius = display.number(np.asarray(self._temperature) - 273.15, 4)
        return f"{self.name} at {celsius} degC ({kelvin} K)"

    def __repr__(self) -> str:
        return display.sheet_text(self._title, self._rows(), self.cautions)

    def _repr_html_(self) -> str:
        return display.sheet_html(self._title, self._rows(), self.cautions)
