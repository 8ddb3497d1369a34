"""The properties as methods of temperature, with their types: floats give float."""

from __future__ import annotations

from abc import ABC, abstractmethod
from typing import Any, overload

from dropkit.validity import Outside

__all__ = ["PropertyMethods"]


class PropertyMethods(ABC):
    """Every property as a method of temperature [K, or with a unit].

    Floats and arrays are SI and give SI back, a Series comes back as a Series; anything with a
    unit gives a Quantity in the trade's unit. ``outside`` is the range policy: ``"raise"``,
    ``"warn"`` (the value, with a warning), ``"nan"`` or ``"allow"`` (the value in silence).

    Examples
    --------
    >>> import dropkit as dk
    >>> ethanol = dk.liquid("ethanol")
    >>> round(ethanol.density(293.15), 1)
    789.3
    >>> print(f"{ethanol.density('20 degC'):.1f}")
    789.3 kilogram / meter ** 3
    """

    @abstractmethod
    def _look(self, prop: str, temperature: Any, outside: Outside) -> Any:
        """How a kind of fluid or state answers for one property."""

    # One overload pair each: floats give float, anything else depends on what is asked.

    @overload
    def density(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def density(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def density(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Density of the liquid [kg/m3].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Density [kg/m3], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("density", temperature, outside)

    @overload
    def viscosity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def viscosity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def viscosity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Dynamic viscosity at low shear [Pa*s].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Viscosity [Pa*s; mPa*s where asked with a unit], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.

        Examples
        --------
        >>> import dropkit as dk
        >>> water = dk.liquid("water")
        >>> round(water.viscosity(293.15), 6)
        0.001002
        >>> print(f"{water.viscosity('20 degC'):.3f}")
        1.002 millipascal * second
        >>> water.viscosity([293.15, 200.0], outside="nan")
        array([0.001002,        nan])
        """
        return self._look("viscosity", temperature, outside)

    @overload
    def kinematic_viscosity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def kinematic_viscosity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def kinematic_viscosity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Kinematic viscosity: dynamic viscosity over density [m2/s].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Kinematic viscosity [m2/s; mm2/s where asked with a unit], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("kinematic_viscosity", temperature, outside)

    @overload
    def surface_tension(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def surface_tension(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def surface_tension(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Surface tension against air or its own vapour [N/m].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Surface tension [N/m; mN/m where asked with a unit], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.

        Examples
        --------
        >>> import dropkit as dk
        >>> round(dk.liquid("water").surface_tension(293.15), 4)
        0.0727
        """
        return self._look("surface_tension", temperature, outside)

    @overload
    def vapour_pressure(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def vapour_pressure(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def vapour_pressure(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Vapour pressure, absolute [Pa].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Vapour pressure [Pa; kPa where asked with a unit], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("vapour_pressure", temperature, outside)

    @overload
    def heat_of_vaporisation(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def heat_of_vaporisation(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def heat_of_vaporisation(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Heat of vaporisation per mass [J/kg].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Heat of vaporisation [J/kg; kJ/kg where asked with a unit], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("heat_of_vaporisation", temperature, outside)

    @overload
    def heat_capacity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def heat_capacity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def heat_capacity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Isobaric heat capacity of the liquid per mass [J/(kg*K)].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Heat capacity [J/(kg*K)], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("heat_capacity", temperature, outside)

    @overload
    def thermal_conductivity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def thermal_conductivity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def thermal_conductivity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Thermal conductivity of the liquid [W/(m*K)].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Thermal conductivity [W/(m*K)], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("thermal_conductivity", temperature, outside)

    @overload
    def static_permittivity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def static_permittivity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def static_permittivity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Relative static permittivity [-].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float or array
            Permittivity over that of the vacuum [-], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("static_permittivity", temperature, outside)

    @overload
    def speed_of_sound(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def speed_of_sound(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def speed_of_sound(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Speed of sound in the liquid [m/s].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Speed of sound [m/s], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("speed_of_sound", temperature, outside)

    @overload
    def refractive_index(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def refractive_index(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def refractive_index(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Refractive index at 589 nm [-].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float or array
            Refractive index [-], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("refractive_index", temperature, outside)

    @overload
    def diffusivity_in_air(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def diffusivity_in_air(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def diffusivity_in_air(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Diffusivity of the vapour in air at 101325 Pa [m2/s].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Diffusivity [m2/s; mm2/s where asked with a unit], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("diffusivity_in_air", temperature, outside)

    @overload
    def electrical_conductivity(self, temperature: float, *, outside: Outside = ...) -> float: ...
    @overload
    def electrical_conductivity(self, temperature: Any, *, outside: Outside = ...) -> Any: ...
    def electrical_conductivity(self, temperature: Any, *, outside: Outside = "raise") -> Any:
        """Electrical conductivity, an order of magnitude [S/m].

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; of any shape that broadcasts with the composition's.
        outside : {"raise", "warn", "nan", "allow"}
            What happens outside the stated range.

        Returns
        -------
        float, array or Quantity
            Electrical conductivity [S/m; uS/cm where asked with a unit], in the common shape.

        Raises
        ------
        MissingProperty, OutOfRange, BadInput
            Not known of this fluid; outside its range; not a temperature or shape that fits.
        """
        return self._look("electrical_conductivity", temperature, outside)
