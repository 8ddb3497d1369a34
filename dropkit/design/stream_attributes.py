"""The quantities of a stream as attributes, in the order of `stream_quantities`."""

from __future__ import annotations

from abc import ABC, abstractmethod
from typing import Any

__all__ = ["StreamAttributes"]


class StreamAttributes(ABC):
    """Every quantity of a stream as an attribute."""

    @abstractmethod
    def _quantity(self, word: str) -> Any:
        """A quantity, in the way the stream was asked for."""

    @property
    def drop_diameter(self) -> Any:
        """Diameter of a drop [m]."""
        return self._quantity("drop_diameter")

    @property
    def drop_volume(self) -> Any:
        """Volume of a drop [m3]."""
        return self._quantity("drop_volume")

    @property
    def drop_mass(self) -> Any:
        """Mass of a drop [kg]."""
        return self._quantity("drop_mass")

    @property
    def frequency(self) -> Any:
        """Drops per second from one hole, the drive's frequency [Hz]."""
        return self._quantity("frequency")

    @property
    def drop_rate(self) -> Any:
        """Drops per second from all holes [Hz]."""
        return self._quantity("drop_rate")

    @property
    def flow(self) -> Any:
        """Volume flow of one hole [m3/s]."""
        return self._quantity("flow")

    @property
    def total_flow(self) -> Any:
        """Volume flow of all holes [m3/s]."""
        return self._quantity("total_flow")

    @property
    def mass_flow(self) -> Any:
        """Mass flow of all holes [kg/s]."""
        return self._quantity("mass_flow")

    @property
    def velocity(self) -> Any:
        """Speed of the jet [m/s]."""
        return self._quantity("velocity")

    @property
    def jet_diameter(self) -> Any:
        """Diameter of the jet [m]."""
        return self._quantity("jet_diameter")

    @property
    def wavelength(self) -> Any:
        """Length of the wave on the jet, the pitch of the drops [m]."""
        return self._quantity("wavelength")

    @property
    def wavelength_ratio(self) -> Any:
        """Wavelength over jet diameter [-]."""
        return self._quantity("wavelength_ratio")

    @property
    def drop_ratio(self) -> Any:
        """Drop diameter over jet diameter [-]."""
        return self._quantity("drop_ratio")

    @property
    def nozzle_diameter(self) -> Any:
        """Diameter of the hole [m]."""
        return self._quantity("nozzle_diameter")

    @property
    def nozzle_length(self) -> Any:
        """Length of the hole [m]."""
        return self._quantity("nozzle_length")

    @property
    def contraction(self) -> Any:
        """Jet diameter over hole diameter [-]."""
        return self._quantity("contraction")

    @property
    def gauge_pressure(self) -> Any:
        """Pressure ahead of the hole, above the surroundings [Pa]."""
        return self._quantity("gauge_pressure")

    @property
    def pressure_kinetic(self) -> Any:
        """Of it, what moves the liquid [Pa]."""
        return self._quantity("pressure_kinetic")

    @property
    def pressure_entry(self) -> Any:
        """Of it, what is lost at the entry [Pa]."""
        return self._quantity("pressure_entry")

    @property
    def pressure_viscous(self) -> Any:
        """Of it, what friction takes [Pa]."""
        return self._quantity("pressure_viscous")

    @property
    def pressure_capillary(self) -> Any:
        """Of it, what surface tension holds in the jet [Pa]."""
        return self._quantity("pressure_capillary")

    @property
    def growth_rate(self) -> Any:
        """Growth rate of the driven wave [1/s]."""
        return self._quantity("growth_rate")

    @property
    def breakup_length(self) -> Any:
        """Distance from the hole to the first drop [m]."""
        return self._quantity("breakup_length")

    @property
    def breakup_length_low(self) -> Any:
        """Low end of its 95 % band [m]."""
        return self._quantity("breakup_length_low")

    @property
    def breakup_length_high(self) -> Any:
        """High end of its 95 % band [m]."""
        return self._quantity("breakup_length_high")

    @property
    def breakup_time(self) -> Any:
        """Time from the hole to the first drop [s]."""
        return self._quantity("breakup_time")

    @property
    def radius_amplitude(self) -> Any:
        """Amplitude of the radius at the hole that the drive makes [m]."""
        return self._quantity("radius_amplitude")

    @property
    def weber(self) -> Any:
        """Weber number of the jet, on its diameter [-]."""
        return self._quantity("weber")

    @property
    def ohnesorge(self) -> Any:
        """Ohnesorge number of the jet, on its diameter [-]."""
        return self._quantity("ohnesorge")

    @property
    def reynolds(self) -> Any:
        """Reynolds number of the hole, on its diameter [-]."""
        return self._quantity("reynolds")

    @property
    def gas_weber(self) -> Any:
        """Weber number with the gas's density, on the jet's diameter [-]."""
        return self._quantity("gas_weber")

    @property
    def shear_rate(self) -> Any:
        """Shear rate at the wall of the hole, parabolic profile [1/s]."""
        return self._quantity("shear_rate")
