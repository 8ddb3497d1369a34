"""The properties as methods of temperature, with their types: floats give float."""

from __future__ import annotations

from typing import Any, overload

from dropkit.validity import Outside

__all__ = ["PropertyMethods"]


class PropertyMethods:
    """Every property as a method of temperature [K, or with a unit].

    Floats and arrays are SI and give SI back; anything with a unit gives a Quantity in the
    trade's unit. ``outside`` is the range policy: ``"raise"``, ``"warn"``, ``"nan"`` or ``"allow"``.
    """

    def _look(self, prop: str, temperature: Any, outside: Outside) -> Any:
        raise NotImplementedError

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
