"""The properties as attributes, in the order of `property_methods`: numbers at one condition."""

from __future__ import annotations

from abc import ABC, abstractmethod
from typing import Any

__all__ = ["PropertyAttributes"]


class PropertyAttributes(ABC):
    """Every property of a liquid as an attribute."""

    @abstractmethod
    def _property(self, prop: str) -> Any:
        """How a kind of fluid or state answers for one property."""

    @property
    def density(self) -> Any:
        """Density [kg/m3]."""
        return self._property("density")

    @property
    def viscosity(self) -> Any:
        """Dynamic viscosity at low shear [Pa*s]."""
        return self._property("viscosity")

    @property
    def kinematic_viscosity(self) -> Any:
        """Kinematic viscosity [m2/s]."""
        return self._property("kinematic_viscosity")

    @property
    def surface_tension(self) -> Any:
        """Surface tension [N/m]."""
        return self._property("surface_tension")

    @property
    def vapour_pressure(self) -> Any:
        """Vapour pressure, absolute [Pa]."""
        return self._property("vapour_pressure")

    @property
    def heat_of_vaporisation(self) -> Any:
        """Heat of vaporisation [J/kg]."""
        return self._property("heat_of_vaporisation")

    @property
    def heat_capacity(self) -> Any:
        """Isobaric heat capacity of the liquid [J/(kg*K)]."""
        return self._property("heat_capacity")

    @property
    def thermal_conductivity(self) -> Any:
        """Thermal conductivity [W/(m*K)]."""
        return self._property("thermal_conductivity")

    @property
    def static_permittivity(self) -> Any:
        """Relative static permittivity [-]."""
        return self._property("static_permittivity")

    @property
    def speed_of_sound(self) -> Any:
        """Speed of sound [m/s]."""
        return self._property("speed_of_sound")

    @property
    def refractive_index(self) -> Any:
        """Refractive index at 589 nm [-]."""
        return self._property("refractive_index")

    @property
    def diffusivity_in_air(self) -> Any:
        """Diffusivity of the vapour in air at 101325 Pa [m2/s]."""
        return self._property("diffusivity_in_air")

    @property
    def electrical_conductivity(self) -> Any:
        """Electrical conductivity, an order of magnitude [S/m]."""
        return self._property("electrical_conductivity")
