"""What every liquid, mixture and user's fluid can be asked: one interface for all of them."""

from __future__ import annotations

from collections.abc import Mapping
from typing import TYPE_CHECKING, Any

from dropkit import units
from dropkit.properties.evaluation import Evaluation
from dropkit.properties.property_words import property_name
from dropkit.properties.traced import Traced
from dropkit.provenance import Trail
from dropkit.validity import Outside, Range, check_outside

if TYPE_CHECKING:
    from dropkit.properties.search import Found
    from dropkit.properties.state import State

__all__ = ["Fluid"]


class Fluid(Evaluation, Traced):
    """Base of liquids, mixtures and users' fluids.

    Every property is a method of temperature [K, or with a unit]: floats and arrays
    are SI and give SI back, anything with a unit gives a Quantity in the trade's unit.
    ``outside`` is the range policy: ``"raise"``, ``"warn"``, ``"nan"`` or ``"allow"``.
    """

    def _broadcast(self, shape: tuple[int, ...]) -> Fluid:
        return self

    # ------------------------------------------------ what it rests on
    def range(self, prop: str) -> Range:
        """The stated temperature range [K] of a property.

        Parameters
        ----------
        prop : str
            A property such as ``"viscosity"``.

        Returns
        -------
        Range
            With the ends `low` and `high`.

        Raises
        ------
        UnknownName, MissingProperty
            No property is called so; the fluid does not have it.

        Examples
        --------
        >>> import dropkit as dk
        >>> print(dk.liquid("water").range("density"))
        273.15 to 423.15 K (0 to 150 degC)
        """
        property_name(prop)
        if prop not in self.available():
            raise self._missing(prop)
        return self._range(prop)

    def uncertainty(self, prop: str, temperature: Any = None) -> float | None:
        """Relative standard uncertainty (k = 1) of a property.

        Parameters
        ----------
        prop : str
            A property such as ``"viscosity"``.
        temperature : float, array or with a unit, optional
            Where it is asked [K]; by default over all records.

        Returns
        -------
        float or None
            The largest over the temperatures [-]; None where none is known, as out of range.

        Raises
        ------
        UnknownName, MissingProperty, BadInput
            No property is called so; the fluid does not have it; no temperature.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.liquid("water").uncertainty("viscosity", "20 degC")
        0.005
        """
        return self.trail(prop, temperature).uncertainty

    def trail(self, prop: str, temperature: Any = None) -> Trail:
        """How a property is made: records, methods, grade, ranges, cautions.

        Parameters
        ----------
        prop : str
            A property such as ``"viscosity"``.
        temperature : float, array or with a unit, optional
            Where it is asked [K]. Where given, only the records that serve it are named,
            with the cautions that apply there, such as ``"supercooled"``.

        Returns
        -------
        Trail
            Printed, one line for each record.

        Raises
        ------
        UnknownName, MissingProperty, BadInput
            No property is called so; the fluid does not have it; no temperature.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.liquid("water").trail("viscosity").sources
        ('IAPWS2008viscosity',)
        """
        property_name(prop)
        if prop not in self.available():
            raise self._missing(prop)
        kelvin = None if temperature is None else units.to_si(temperature, "temperature")
        if kelvin is not None:
            self._common_shape(kelvin)
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

        Returns
        -------
        State
            With every property as an attribute, computed when it is first asked.

        Raises
        ------
        BadInput
            No temperature, or another word for `outside`.

        Examples
        --------
        >>> import dropkit as dk
        >>> round(dk.liquid("water").at(293.15).surface_tension, 4)
        0.0727
        """
        from dropkit.properties.state import State

        check_outside(outside)
        kelvin, asked = units.read(temperature, "temperature", "temperature")
        if hasattr(kelvin, "to_numpy"):
            kelvin = kelvin.to_numpy(dtype=float)
        self._common_shape(kelvin)
        return State(self, kelvin, asked=asked, outside=outside)

    def with_values(
        self,
        *,
        at: Any = None,
        plausible: bool = True,
        uncertainty: Mapping[str, Any] | None = None,
        **values: Any,
    ) -> Fluid:
        """The same fluid with measured values in place of the records'.

        Parameters
        ----------
        at : temperature, optional
            Where the values were measured. Given, a value of a fluid of one composition
            follows the trend of the record that it replaces, and one that replaces nothing
            holds within 0.5 K; left out, values are held constant. All is listed under the
            assumptions.
        plausible : bool
            False accepts values that no ordinary liquid has.
        uncertainty : mapping, optional
            Relative standard uncertainty (k = 1) by property.
        **values
            Properties by name, each a number (SI), with a unit, or ``(temperature, value)``
            pairs as `dropkit.fluid` takes them.

        Returns
        -------
        OwnFluid
            With the grade ``"own"``, or that of the trend where this is worse.

        Raises
        ------
        UnknownName, UnitError, ImplausibleValue, BadInput
            No such property; a slip in a value, with the likely cure.
        OutOfRange
            A record's trend is not known where the value was measured.

        Examples
        --------
        >>> import dropkit as dk
        >>> ink = dk.liquid("water").with_values(surface_tension="31 mN/m", at="20 degC")
        >>> round(ink.surface_tension(303.15) * 1e3, 1)
        30.3
        """
        from dropkit.properties.own import overlay

        return overlay(self, values, at=at, plausible=plausible, uncertainty=uncertainty)

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

        Raises
        ------
        UnknownName, MissingProperty
            No such property or component; the fluid does not have it.
        BadInput
            Not one property, no temperature, nothing to vary, or ends that don't fit.
        OutOfRange
            The property is known nowhere between the ends.

        Examples
        --------
        >>> import dropkit as dk
        >>> ink = dk.mixture({"glycerol": 0.3, "water": "rest"}, by="mass")
        >>> ink.find(viscosity="4.5 mPa*s", at="20 degC")
        viscosity = 4.5 mPa*s at 44.39 % glycerol by mass
        """
        from dropkit.properties.search import find

        return find(self, target, at=at, vary=vary, between=between, by=by, plausible=plausible)
