"""`Air`: the frozen properties of humid air at one condition or an array of conditions."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

import numpy as np

from dropkit import units
from dropkit.errors import BadInput, DropkitError, UnknownName, nearest
from dropkit.properties import display
from dropkit.properties.gas_statements import STATEMENTS, gas_trail
from dropkit.properties.gas_values import Point, gas_value
from dropkit.properties.jsonable import from_plain, frozen, to_plain
from dropkit.properties.traced import Traced
from dropkit.provenance import Trail
from dropkit.unit_table import KINDS
from dropkit.validity import Outside

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["Air"]


class Air(Traced):
    """Air at one condition or an array of conditions; made by `air`.

    Immutable. Each property is an attribute, computed on first access and then kept. Asked for
    with a unit it gives Quantities, asked for in SI it gives SI; `si` and `with_units` turn it
    over.

    Parameters
    ----------
    point : tuple
        Temperature [K], pressure [Pa] and mole fraction of water.
    humidity : float or ndarray
        Relative humidity over liquid water.
    asked : Asked or None
        How results are given.
    outside : {"raise", "warn", "nan", "allow"}
        The range policy.
    index : pandas.Index, optional
        Of the Series that it was asked with.

    Examples
    --------
    >>> import dropkit as dk
    >>> room = dk.air("20 degC", humidity="50 %")
    >>> print(f"{room.dew_point:.1f}")
    9.3 degree_Celsius
    >>> round(room.si().mean_free_path * 1e9, 1)
    66.2
    """

    __slots__ = ("_asked", "_humidity", "_index", "_outside", "_point", "_values")

    name = "air"
    _asked: Any
    _humidity: Any
    _index: Any
    _outside: Outside
    _point: Point
    _values: dict[str, Any]

    def __init__(
        self, point: Any, humidity: Any, asked: Any, outside: Outside, index: Any = None
    ) -> None:
        for slot, value in (
            ("_point", Point(*map(frozen, point))),
            ("_humidity", frozen(humidity)),
            ("_asked", asked),
            ("_outside", outside),
            ("_index", index),
            ("_values", {}),
        ):
            object.__setattr__(self, slot, value)

    def __setattr__(self, name: str, value: Any) -> None:
        raise AttributeError("Air is immutable; make another with dropkit.air")

    def __delattr__(self, name: str) -> None:
        raise AttributeError("Air is immutable")

    def __eq__(self, other: object) -> bool:
        return isinstance(other, Air) and other.to_dict() == self.to_dict()

    # ------------------------------------------------ how it was asked
    def si(self) -> Air:
        """The same air giving SI floats and arrays.

        Returns
        -------
        Air
            What was computed is shared.

        Examples
        --------
        >>> import dropkit as dk
        >>> round(dk.air("20 degC").si().density, 3)
        1.205
        """
        return self._turned(None)

    def with_units(self) -> Air:
        """The same air giving Quantities.

        Returns
        -------
        Air
            What was computed is shared.

        Examples
        --------
        >>> import dropkit as dk
        >>> print(f"{dk.air(293.15).with_units().density:.3f}")
        1.205 kilogram / meter ** 3
        """
        return self._turned(self._asked or units.Asked())

    def _turned(self, asked: Any) -> Air:
        twin = Air(self._point, self._humidity, asked, self._outside, self._index)
        object.__setattr__(twin, "_values", self._values)
        return twin

    def __reduce__(self) -> tuple[Any, ...]:
        return (Air, (tuple(self._point), self._humidity, self._asked, self._outside, self._index))

    def _give(self, kind: str, value: Any) -> Any:
        if self._index is not None:
            import pandas as pd

            return pd.Series(value, index=self._index)
        return units.give(value, kind, self._asked)

    # ------------------------------------------------ values
    def _si(self, prop: str) -> Any:
        if prop not in self._values:
            value = gas_value(prop, self._point, self._outside)
            if isinstance(value, np.ndarray):
                value.flags.writeable = False
            self._values[prop] = value
        return self._values[prop]

    def _property(self, prop: str) -> Any:
        return self._give(STATEMENTS[prop].kind, self._si(prop))

    @property
    def temperature(self) -> Any:
        """Temperature [K]."""
        return self._give("temperature", self._point.temperature)

    @property
    def pressure(self) -> Any:
        """Absolute pressure [Pa]."""
        return self._give("absolute_pressure", self._point.pressure)

    @property
    def humidity(self) -> Any:
        """Relative humidity over liquid water [0..1]."""
        return self._give("humidity", self._humidity)

    @property
    def density(self) -> Any:
        """Density [kg/m3]."""
        return self._property("density")

    @property
    def viscosity(self) -> Any:
        """Dynamic viscosity [Pa*s]."""
        return self._property("viscosity")

    @property
    def kinematic_viscosity(self) -> Any:
        """Kinematic viscosity [m2/s]."""
        return self._property("kinematic_viscosity")

    @property
    def thermal_conductivity(self) -> Any:
        """Thermal conductivity [W/(m*K)]."""
        return self._property("thermal_conductivity")

    @property
    def heat_capacity(self) -> Any:
        """Isobaric heat capacity by mass of humid air [J/(kg*K)]."""
        return self._property("heat_capacity")

    @property
    def vapour_diffusivity(self) -> Any:
        """Diffusivity of water vapour in air at this pressure [m2/s]."""
        return self._property("vapour_diffusivity")

    @property
    def mean_free_path(self) -> Any:
        """Mean free path of the gas [m]."""
        return self._property("mean_free_path")

    @property
    def molar_mass(self) -> Any:
        """Molar mass of humid air [kg/mol]."""
        return self._property("molar_mass")

    @property
    def saturation_vapour_pressure(self) -> Any:
        """Vapour pressure of liquid water at this temperature [Pa]."""
        return self._property("saturation_vapour_pressure")

    @property
    def water_mole_fraction(self) -> Any:
        """Mole fraction of water vapour [-]."""
        return self._property("water_mole_fraction")

    @property
    def vapour_pressure(self) -> Any:
        """Partial pressure of the water vapour [Pa]."""
        return self._property("vapour_pressure")

    @property
    def dew_point(self) -> Any:
        """Temperature at which this air is saturated over liquid water [K]; none for dry air."""
        return self._property("dew_point")

    # ------------------------------------------------ what it rests on
    def available(self) -> tuple[str, ...]:
        """Names of the properties that can be asked.

        Returns
        -------
        tuple of str
            In the order of tables; without the dew point for dry air.
        """
        dry = bool(np.all(np.equal(self._point.x, 0.0)))
        return tuple(prop for prop in STATEMENTS if not (dry and prop == "dew_point"))

    def trail(self, prop: str) -> Trail:
        """How a property was made: equation, grade, uncertainty, sources, assumptions.

        Parameters
        ----------
        prop : str
            A property such as ``"viscosity"``.

        Returns
        -------
        Trail
            With the largest uncertainty of an array's elements.

        Raises
        ------
        UnknownName
            Air has no property of this name.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.air("20 degC").trail("viscosity").sources
        ('LemmonJacobsen2004',)
        """
        if prop not in STATEMENTS:
            raise UnknownName(
                f"air has no property {prop!r}",
                allowed=", ".join(STATEMENTS),
                choices=nearest(str(prop), STATEMENTS),
            )
        return gas_trail(prop, self._point.temperature, self._point.pressure, self._point.x)

    @property
    def assumptions(self) -> tuple[str, ...]:
        """What was taken for granted in any property."""
        texts = (text for prop in self.available() for text in self.trail(prop).assumptions)
        return tuple(dict.fromkeys(texts))

    @property
    def cautions(self) -> tuple[str, ...]:
        """What to know before use."""
        texts = (text for prop in self.available() for text in self.trail(prop).cautions)
        return tuple(dict.fromkeys(texts))

    @property
    def sources(self) -> tuple[str, ...]:
        """Keys of the sources that the properties rest on."""
        keys = (key for prop in self.available() for key in self.trail(prop).sources)
        return tuple(dict.fromkeys(keys))

    # ------------------------------------------------ tables, dicts, display
    def table(self) -> pd.DataFrame:
        """Every property with unit, uncertainty, method, grade, source and range.

        Returns
        -------
        pandas.DataFrame
            One row per property, indexed by its name; for arrays, the value column holds one
            array per row. `uncertainty` is relative, k = 1; `uncertainty_95` is in the unit of
            the value. Properties that cannot be given here stand with NaN and the reason.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.air("20 degC").table().loc["mean_free_path", "unit"]
        'nm'
        """
        import pandas as pd

        rows = []
        for prop in self.available():
            try:
                value, trail = self._si(prop), self.trail(prop)
            except DropkitError as problem:
                rows.append({"property": prop, "value": float("nan"), "method": str(problem)})
                continue
            kind, spread = STATEMENTS[prop].kind, trail.uncertainty or 0.0
            rows.append(
                {
                    "property": prop,
                    "value": self._shown(kind, value),
                    "unit": display.unit_of(kind, with_units=self._asked is not None),
                    "uncertainty": spread,
                    "uncertainty_95": 2.0 * spread * (value / self._scale(kind)),
                    "grade": trail.grade,
                    "method": trail.method,
                    "sources": ", ".join(trail.sources),
                    "range": trail.range,
                }
            )
        return pd.DataFrame(rows).set_index("property")

    def to_dict(self) -> dict[str, Any]:
        """A dict of plain types that survives JSON; `from_dict` rebuilds the air.

        Returns
        -------
        dict
            The condition and the values [SI].

        Examples
        --------
        >>> import dropkit as dk
        >>> room = dk.air("20 degC", humidity="50 %")
        >>> type(room).from_dict(room.to_dict()).dew_point == room.dew_point
        True
        """
        values = {}
        for prop in self.available():
            try:
                values[prop] = to_plain(self._si(prop))
            except DropkitError:
                continue
        return {
            "kind": "Air",
            "temperature": to_plain(self._point.temperature),
            "pressure": to_plain(self._point.pressure),
            "humidity": to_plain(self._humidity),
            "water_mole_fraction": to_plain(self._point.x),
            "with_units": self._asked is not None,
            "outside": self._outside,
            "values": values,
        }

    @classmethod
    def from_dict(cls, data: dict[str, Any]) -> Air:
        """Rebuild an air from `to_dict`, also after a passage through JSON.

        Parameters
        ----------
        data : dict
            What `to_dict` gave.

        Returns
        -------
        Air
            In SI or with units, as it was.

        Raises
        ------
        BadInput
            The dict of something else.
        """
        needed = {
            "temperature",
            "pressure",
            "water_mole_fraction",
            "humidity",
            "with_units",
            "outside",
        }
        if not isinstance(data, dict) or data.get("kind") != "Air" or not needed <= data.keys():
            raise BadInput("This is no dict of an Air", allowed="what Air.to_dict() gave")
        names = ("temperature", "pressure", "water_mole_fraction", "humidity")
        *point, humidity = (from_plain(data[name]) for name in names)
        asked = units.Asked() if data["with_units"] else None
        return cls(point, humidity, asked, data["outside"])

    def _scale(self, kind: str) -> float:
        return KINDS[kind].per_stock if self._asked is not None else 1.0

    def _shown(self, kind: str, value: Any) -> Any:
        if kind == "temperature" and self._asked is not None:
            return value - KINDS[kind].zero
        return value / self._scale(kind)

    def _rows(self) -> list[tuple[str, ...]]:
        rows = []
        for prop in self.available():
            try:
                value, trail = self._si(prop), self.trail(prop)
            except DropkitError as problem:
                rows.append(display.sheet_row(prop, "", "", None, str(problem)))
                continue
            kind = STATEMENTS[prop].kind
            shown = display.number(self._shown(kind, value), 5)
            unit = display.unit_of(kind, with_units=self._asked is not None)
            rows.append(display.sheet_row(prop, shown, unit, trail))
        return rows

    @property
    def _title(self) -> str:
        celsius = display.number(np.asarray(self._point.temperature) - 273.15, 4)
        kilopascal = display.number(np.asarray(self._point.pressure) / 1e3, 6)
        wet = display.number(100.0 * np.asarray(self._humidity), 3)
        return f"air at {celsius} degC, {kilopascal} kPa absolute, {wet} % relative humidity"

    def __repr__(self) -> str:
        return display.sheet_text(self._title, self._rows(), self.cautions)

    def _repr_html_(self) -> str:
        return display.sheet_html(self._title, self._rows(), self.cautions)
