"""What every liquid, mixture and user's fluid can be asked: one interface for all of them."""

from __future__ import annotations

import warnings
from collections.abc import Callable, Sequence
from typing import TYPE_CHECKING, Any, Final, overload

import numpy as np

from dropkit import units
from dropkit.errors import (
    DropkitWarning,
    MissingProperty,
    RecalledWarning,
    UnknownName,
    nearest,
)
from dropkit.properties.curves import CHUNK, Fast, FloatArray
from dropkit.provenance import Grade, Trail, worst_grade
from dropkit.records import PropertyRecord
from dropkit.validity import Outside, Range, check_outside, settle

if TYPE_CHECKING:
    from dropkit.properties.search import Found
    from dropkit.properties.state import State

__all__ = ["GRADED", "KELVIN_HINT", "PROPERTIES", "Fluid", "property_name"]

# Every property by its word in the interface, in the order in which tables show them.
PROPERTIES: Final[dict[str, str]] = {
    "density": "mass per volume",
    "viscosity": "dynamic viscosity at low shear",
    "kinematic_viscosity": "dynamic viscosity over density",
    "surface_tension": "against air or its own vapour",
    "vapour_pressure": "absolute",
    "heat_of_vaporisation": "per mass",
    "heat_capacity": "of the liquid at constant pressure, per mass",
    "thermal_conductivity": "of the liquid",
    "static_permittivity": "relative, at low frequency",
    "speed_of_sound": "in the liquid",
    "refractive_index": "at 589 nm",
    "diffusivity_in_air": "of the vapour, at 101325 Pa",
    "electrical_conductivity": "order of magnitude: traces of water and ions decide it",
}
# The grade of a liquid is the worst of these.
GRADED: Final = ("density", "viscosity", "surface_tension")

KELVIN_HINT: Final = (
    "Bare temperatures are in kelvin: kelvin expected, 25 degC is 298.15; "
    "with a unit write '25 degC'"
)


def property_name(name: str) -> str:
    """`name` if it is a property; else UnknownName with the nearest ones."""
    if isinstance(name, str) and name in PROPERTIES:
        return name
    raise UnknownName(
        f"No property is called {name!r}",
        allowed=", ".join(PROPERTIES),
        choices=nearest(str(name), PROPERTIES),
    )


class Fluid:
    """Base of liquids, mixtures and users' fluids.

    Every property is a method of temperature [K, or with a unit]: floats and arrays
    are SI and give SI back, anything with a unit gives a Quantity in the trade's unit.
    ``outside`` is the range policy: ``"raise"``, ``"warn"``, ``"nan"`` or ``"allow"``.
    """

    name: str

    def __init__(self) -> None:
        self._fast: dict[str, Fast] = {}
        self._looked: set[str] = set()

    # ------------------------------------------------ what a kind of fluid must say
    def available(self) -> tuple[str, ...]:
        """Names of the properties that this fluid has, in the order of tables."""
        raise NotImplementedError

    @property
    def cautions(self) -> tuple[str, ...]:
        """What a user should know whatever property is asked."""
        raise NotImplementedError

    def _range(self, prop: str) -> Range:
        """Stated temperature range of a property."""
        raise NotImplementedError

    def _scalar(self, prop: str) -> Callable[[float], float] | None:
        """The quick evaluator for one temperature, or None where the composition is an array."""
        raise NotImplementedError

    def _fill(self, prop: str, part: slice, temperature: FloatArray, out: FloatArray) -> None:
        """Evaluate a flat chunk; `part` says which elements of the broadcast it covers."""
        raise NotImplementedError

    def _trail(self, prop: str, temperature: float | FloatArray | None) -> Trail:
        raise NotImplementedError

    def _blocks(self, prop: str) -> Sequence[PropertyRecord]:
        """The records that a property rests on, at whatever temperature."""
        raise NotImplementedError

    def _shape(self) -> tuple[int, ...]:
        """Shape of the composition; () for one composition."""
        return ()

    def _broadcast(self, shape: tuple[int, ...]) -> Fluid:
        """The same fluid with its composition broadcast to `shape` and made flat."""
        return self

    def _missing(self, prop: str) -> MissingProperty:
        has = self.available()
        return MissingProperty(
            f"{self.name} has no {prop}",
            allowed="it has " + ", ".join(has),
            hint=f"If you have measured it, add it: with_values({prop}=...)",
        )

    def _settle_point(self, prop: str, temperature: Any, outside: str) -> Any:
        """Apply the range policy to composition and temperature together; the mask for NaN."""
        return False

    # ------------------------------------------------ evaluation
    def _look(self, prop: str, temperature: Any, outside: Outside) -> Any:
        if type(temperature) is float and outside == "raise":
            fast = self._fast.get(prop)
            if fast is not None:
                low, high, value = fast
                if low <= temperature <= high:
                    return value(temperature)
        check_outside(outside)
        kelvin, asked = units.read(temperature, "temperature", "temperature")
        fast = self._fast.get(prop)
        if fast is not None and type(kelvin) is float and fast.low <= kelvin <= fast.high:
            return units.give(fast.value(kelvin), prop, asked)
        self._warn_if_recalled(prop)
        return units.give(self._evaluate(prop, kelvin, outside), prop, asked)

    def _warn_if_recalled(self, prop: str) -> None:
        """One warning per fluid and property where a record from memory enters."""
        if prop in self._looked or prop not in self.available():
            return
        self._looked.add(prop)
        used = [block.label for block in self._blocks(prop) if block.grade == "recalled"]
        if used:
            warnings.warn(
                f"{prop} of {self.name} rests on memory ({', '.join(used)}; grade 'recalled'): "
                "uncertain by 5 % at least",
                RecalledWarning,
                stacklevel=4,
            )

    def _evaluate(self, prop: str, temperature: Any, outside: Outside) -> Any:
        """A property at SI temperatures: float, array or Series, with the range policy applied."""
        if prop not in self.available():
            raise self._missing(prop)
        if hasattr(temperature, "index") and hasattr(temperature, "to_numpy"):
            values = self._evaluate(prop, temperature.to_numpy(dtype=float), outside)
            return type(temperature)(values, index=temperature.index, name=prop)
        limits = self._range(prop)
        if isinstance(temperature, np.ndarray) and self._composition_is_settled():
            good = self._all_inside(prop, temperature, limits)
            if good is not None:
                return good
        lost: Any = False
        if not limits.covers(temperature):
            lowest = np.fmin.reduce(np.ravel(temperature), initial=np.inf)
            hint = KELVIN_HINT if lowest < 150.0 and limits.low > 150.0 else ""
            lost = settle(f"{prop} of {self.name}", temperature, limits, outside, hint=hint)
        unfit = self._settle_point(prop, temperature, outside)
        if not isinstance(temperature, np.ndarray) and self._shape() == ():
            return self._one(prop, temperature, limits, lost or unfit)
        return self._many(prop, temperature, limits, lost, unfit)

    def _composition_is_settled(self) -> bool:
        """Whether only the temperature can be out of range."""
        return True

    def _all_inside(self, prop: str, temperature: FloatArray, limits: Range) -> Any:
        """Values where all temperatures are in range, else None; checks ride on the chunks."""
        flat = temperature.reshape(-1)
        out = np.empty(flat.size)
        for start in range(0, flat.size, CHUNK):
            part = slice(start, start + CHUNK)
            piece, values = flat[part], out[part]
            if not limits.covers(piece):
                return None
            self._fill(prop, part, piece, values)
            if not (values.min() > 0.0 and values.max() < np.inf):
                return None
        return out.reshape(temperature.shape)

    def _one(self, prop: str, temperature: float, limits: Range, lost: Any) -> float:
        value = self._scalar(prop)
        assert value is not None
        self._fast.setdefault(prop, Fast(limits.low, limits.high, value))
        # Written so that NaN comes out as NaN without a warning.
        if lost or temperature != temperature:
            return float("nan")
        if temperature < 0.5 * limits.low:
            return self._not_finite(prop, 1)
        try:
            result = value(temperature)
        except (ArithmeticError, ValueError):
            return self._not_finite(prop, 1)
        if not 0.0 < result < float("inf"):
            return self._not_finite(prop, 1)
        return result

    def _many(self, prop: str, temperature: Any, limits: Range, lost: Any, unfit: Any) -> Any:
        shape = np.broadcast_shapes(np.shape(temperature), self._shape())
        flat = np.broadcast_to(temperature, shape).reshape(-1)
        fluid = self._broadcast(shape)
        work = np.empty(flat.size)
        with np.errstate(all="ignore"):
            for start in range(0, flat.size, CHUNK):
                part = slice(start, start + CHUNK)
                fluid._fill(prop, part, flat[part], work[part])
        out = work.reshape(shape)
        # NaN fails these comparisons and takes the long way.
        good = out.size == 0 or (out.min() > 0.0 and out.max() < np.inf)
        inside = lost is False and unfit is False and limits.covers(np.asarray(temperature))
        if good and (inside or not out.size):
            return out
        asked_nan = np.broadcast_to(np.isnan(temperature), shape)
        deep = np.broadcast_to(np.asarray(temperature) < 0.5 * limits.low, shape)
        gone = np.broadcast_to(np.asarray(lost) | np.asarray(unfit), shape)
        broken = ~((out > 0.0) & (out < np.inf)) | deep
        if broken.any() or gone.any():
            fresh = int((broken & ~asked_nan & ~gone).sum())
            out[broken | gone] = np.nan
            if fresh:
                self._not_finite(prop, fresh)
        return out

    def _not_finite(self, prop: str, count: int) -> float:
        many = "1 value" if count == 1 else f"{count} values"
        warnings.warn(
            f"{prop} of {self.name}: {many} far outside the range came out non-finite or not "
            "positive and became NaN",
            DropkitWarning,
            stacklevel=5,
        )
        return float("nan")

    # ------------------------------------------------ what it rests on
    def grade(self, prop: str | None = None) -> Grade:
        """The grade of a property, or of the fluid: its worst of density, viscosity, surface tension."""
        if prop is not None:
            return self.trail(prop).grade
        held = [self._trail(name, None).grade for name in GRADED if name in self.available()]
        return worst_grade(held) if held else "estimated"

    def range(self, prop: str) -> Range:
        """The stated temperature range [K] of a property."""
        property_name(prop)
        if prop not in self.available():
            raise self._missing(prop)
        return self._range(prop)

    def uncertainty(self, prop: str, temperature: Any = None) -> float | None:
        """Relative standard uncertainty (k = 1) of a property, where one is stated."""
        return self.trail(prop, temperature).uncertainty

    def trail(self, prop: str, temperature: Any = None) -> Trail:
        """How a property is made: records, methods, grade, ranges, cautions.

        Parameters
        ----------
        prop : str
            A property such as ``"viscosity"``.
        temperature : float, array or with a unit, optional
            Where given, only the records that serve it are named, with the cautions that
            apply there, such as ``"supercooled"``.
        """
        property_name(prop)
        if prop not in self.available():
            raise self._missing(prop)
        kelvin = None if temperature is None else units.to_si(temperature, "temperature")
        return self._trail(prop, kelvin)

    @property
    def sources(self) -> tuple[str, ...]:
        """Keys of all sources that this fluid's properties rest on."""
        keys = (key for prop in self.available() for key in self._trail(prop, None).sources)
        return tuple(dict.fromkeys(keys))

    # ------------------------------------------------ conditions and searches
    def at(self, temperature: Any, *, outside: Outside = "raise") -> State:
        """Frozen numbers at one condition.

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K].
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside a stated range.
        """
        from dropkit.properties.state import State

        check_outside(outside)
        kelvin, asked = units.read(temperature, "temperature", "temperature")
        if hasattr(kelvin, "to_numpy"):
            kelvin = kelvin.to_numpy(dtype=float)
        return State(self, kelvin, asked=asked, outside=outside)

    def with_values(self, *, at: Any = None, plausible: bool = True, **values: Any) -> Fluid:
        """The same fluid with measured values in place of the records'.

        Parameters
        ----------
        at : temperature, optional
            Where the values were measured. Given, a value follows the trend of the
            record that it replaces; left out, it is held constant. Either is listed
            under the assumptions.
        plausible : bool
            False accepts values that no ordinary liquid has.
        **values
            Properties by name, each a number (SI) or with a unit.
        """
        from dropkit.properties.own import overlay

        return overlay(self, values, at=at, plausible=plausible)

    def find(
        self,
        *,
        at: Any = None,
        vary: str | None = None,
        between: tuple[Any, Any] | None = None,
        by: str = "mass",
        plausible: bool = True,
        **target: Any,
    ) -> Found:
        """Which composition or temperature gives a wanted property.

        Parameters
        ----------
        at : temperature, optional
            Where the property is wanted; needed unless the temperature is varied.
        vary : str, optional
            The component whose fraction is varied, or ``"temperature"``. Left out, the
            temperature is varied where `at` is not given.
        between : pair, optional
            Ends of the search; by default the whole stated range.
        by : {"mass", "mole", "volume"}
            Basis of the fraction that is reported.
        plausible : bool
            False accepts targets that no ordinary liquid has.
        **target
            One property by name with the wanted value, such as ``viscosity="4.5 mPa*s"``.

        Returns
        -------
        Found
            All solutions in the range, or none, with what the range reaches.
        """
        from dropkit.properties.search import find

        return find(self, target, at=at, vary=vary, between=between, by=by, plausible=plausible)

    # ------------------------------------------------ the properties
    # One overload pair each: floats give float, anything else depends on what is asked.

    @overload
    def density(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def density(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def density(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Density [kg/m3] at `temperature` [K, or with a unit]."""
        return self._look("density", temperature, outside)

    @overload
    def viscosity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def viscosity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def viscosity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Dynamic viscosity at low shear [Pa*s] at `temperature` [K, or with a unit]."""
        return self._look("viscosity", temperature, outside)

    @overload
    def kinematic_viscosity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def kinematic_viscosity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def kinematic_viscosity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Kinematic viscosity: dynamic viscosity over density [m2/s] at `temperature` [K, or with a unit]."""
        return self._look("kinematic_viscosity", temperature, outside)

    @overload
    def surface_tension(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def surface_tension(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def surface_tension(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Surface tension against air or its own vapour [N/m] at `temperature` [K, or with a unit]."""
        return self._look("surface_tension", temperature, outside)

    @overload
    def vapour_pressure(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def vapour_pressure(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def vapour_pressure(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Vapour pressure, absolute [Pa] at `temperature` [K, or with a unit]."""
        return self._look("vapour_pressure", temperature, outside)

    @overload
    def heat_of_vaporisation(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def heat_of_vaporisation(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def heat_of_vaporisation(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Heat of vaporisation per mass [J/kg] at `temperature` [K, or with a unit]."""
        return self._look("heat_of_vaporisation", temperature, outside)

    @overload
    def heat_capacity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def heat_capacity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def heat_capacity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Isobaric heat capacity of the liquid per mass [J/(kg*K)] at `temperature` [K, or with a unit]."""
        return self._look("heat_capacity", temperature, outside)

    @overload
    def thermal_conductivity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def thermal_conductivity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def thermal_conductivity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Thermal conductivity of the liquid [W/(m*K)] at `temperature` [K, or with a unit]."""
        return self._look("thermal_conductivity", temperature, outside)

    @overload
    def static_permittivity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def static_permittivity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def static_permittivity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Relative static permittivity [-] at `temperature` [K, or with a unit]."""
        return self._look("static_permittivity", temperature, outside)

    @overload
    def speed_of_sound(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def speed_of_sound(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def speed_of_sound(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Speed of sound in the liquid [m/s] at `temperature` [K, or with a unit]."""
        return self._look("speed_of_sound", temperature, outside)

    @overload
    def refractive_index(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def refractive_index(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def refractive_index(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Refractive index at 589 nm [-] at `temperature` [K, or with a unit]."""
        return self._look("refractive_index", temperature, outside)

    @overload
    def diffusivity_in_air(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def diffusivity_in_air(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def diffusivity_in_air(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Diffusivity of the vapour in air at 101325 Pa [m2/s] at `temperature` [K, or with a unit]."""
        return self._look("diffusivity_in_air", temperature, outside)

    @overload
    def electrical_conductivity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def electrical_conductivity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def electrical_conductivity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Electrical conductivity, an order of magnitude [S/m] at `temperature` [K, or with a unit]."""
        return self._look("electrical_conductivity", temperature, outside)
