"""`Air`: the frozen properties of humid air at one condition or an array of conditions."""

from __future__ import annotations

import warnings
from collections.abc import Callable
from typing import TYPE_CHECKING, Any, Final, NamedTuple

import numpy as np

from dropkit import units
from dropkit.errors import (
    BadInput,
    DropkitError,
    DropkitWarning,
    MissingProperty,
    UnknownName,
    nearest,
)
from dropkit.properties import display, humid_air
from dropkit.properties.gas_statements import STATEMENTS, gas_trail
from dropkit.properties.jsonable import from_plain, frozen, to_plain
from dropkit.provenance import Grade, Trail, worst_grade
from dropkit.unit_table import KINDS
from dropkit.validity import Outside, Range, settle

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["Air"]

DIFFUSING: Final = Range(273.15, 373.15)


class _Point(NamedTuple):
    """The state in SI, and how to compute from it."""

    temperature: Any
    pressure: Any
    x: Any


_COMPUTE: Final[dict[str, Callable[[_Point], Any]]] = {
    "density": lambda at: humid_air.gas_density(*at),
    "viscosity": lambda at: humid_air.gas_viscosity(*at),
    "kinematic_viscosity": lambda at: humid_air.gas_viscosity(*at) / humid_air.gas_density(*at),
    "thermal_conductivity": lambda at: humid_air.gas_thermal_conductivity(*at),
    "heat_capacity": lambda at: humid_air.gas_heat_capacity(*at),
    "vapour_diffusivity": lambda at: humid_air.water_diffusivity(at.temperature, at.pressure),
    "mean_free_path": lambda at: humid_air.gas_mean_free_path(*at),
    "molar_mass": lambda at: (1.0 - at.x) * humid_air.DRY_AIR + at.x * humid_air.WATER,
    "saturation_vapour_pressure": lambda at: humid_air.saturation_pressure(at.temperature),
    "water_mole_fraction": lambda at: at.x,
    "vapour_pressure": lambda at: at.x * at.pressure,
    "dew_point": lambda at: humid_air.dew_point(at.x * at.pressure, at.pressure),
}
# Zero is an answer of these, not a failure.
_MAY_VANISH: Final = frozenset({"water_mole_fraction", "vapour_pressure"})


class Air:
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
    _point: _Point
    _values: dict[str, Any]

    def __init__(
        self, point: Any, humidity: Any, asked: Any, outside: Outside, index: Any = None
    ) -> None:
        for slot, value in (
            ("_point", _Point(*map(frozen, point))),
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

    # ------------------------------------------------ how it was asked
    def si(self) -> Air:
        """The same air giving SI floats and arrays."""
        return self._turned(None)

    def with_units(self) -> Air:
        """The same air giving Quantities."""
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
            value = self._compute(prop)
            if isinstance(value, np.ndarray):
                value.flags.writeable = False
            self._values[prop] = value
        return self._values[prop]

    def _compute(self, prop: str) -> Any:
        at, scalar = self._point, not isinstance(self._point.temperature, np.ndarray)
        known: Any = np.isfinite(at.x)
        mask: Any = False
        if prop == "vapour_diffusivity":
            mask = settle(f"air: {prop}", at.temperature, DIFFUSING, self._outside, stacklevel=5)
        if prop == "dew_point":
            known = known & np.greater(at.x, 0.0)
            if scalar and at.x == 0.0:
                raise MissingProperty(
                    "dry air has no dew point", hint="Give a humidity above zero to dropkit.air"
                )
        # Numpy's own numbers: Python's floats would raise where these give infinity.
        exact = _Point(*(np.asarray(value)[()] for value in at))
        with np.errstate(all="ignore"):
            value = np.asarray(_COMPUTE[prop](exact), dtype=np.float64)
        good = np.isfinite(value) & (value >= 0.0 if prop in _MAY_VANISH else value > 0.0)
        lost = int(np.count_nonzero(~good & known & ~np.asarray(mask)))
        if lost:
            warnings.warn(
                f"air: {prop}: {lost} value(s) had no finite positive result and became NaN",
                DropkitWarning,
                stacklevel=5,
            )
        value = np.where(good & known & ~np.asarray(mask), value, np.nan)
        return float(value) if scalar else value

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
        """Names of the properties that can be asked."""
        dry = bool(np.all(np.equal(self._point.x, 0.0)))
        return tuple(prop for prop in STATEMENTS if not (dry and prop == "dew_point"))

    def trail(self, prop: str) -> Trail:
        """How a property was made: equation, grade, uncertainty, sources, assumptions."""
        if prop not in STATEMENTS:
            raise UnknownName(
                f"air has no property {prop!r}",
                allowed=", ".join(STATEMENTS),
                choices=nearest(str(prop), STATEMENTS),
            )
        return gas_trail(prop, self._point.temperature, self._point.pressure, self._point.x)

    def grade(self, prop: str | None = None) -> Grade:
        """The grade of a property, or the worst of density and viscosity."""
        if prop is not None:
            return self.trail(prop).grade
        return worst_grade(self.trail(name).grade for name in ("density", "viscosity"))

    def uncertainty(self, prop: str) -> float | None:
        """Relative standard uncertainty (k = 1); the largest of an array's elements."""
        return self.trail(prop).uncertainty

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
        """A dict of plain types that survives JSON; `from_dict` rebuilds the air."""
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
        """Rebuild an air from `to_dict`, also after a passage through JSON."""
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
