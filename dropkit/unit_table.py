"""The kinds of quantity that dropkit knows, and the words that stand for them.

Everything here is data: dimensions, stock units, domains, plausibility windows with the
slips that are likely behind a value outside them. The units themselves stand in
:mod:`dropkit.unit_trade`.
"""

from __future__ import annotations

import math
from dataclasses import dataclass
from functools import lru_cache
from typing import Final, NamedTuple, TypeAlias

from dropkit.errors import BadInput, nearest
from dropkit.validity import Domain

__all__ = ["KINDS", "NOMENCLATURE", "Kind", "Slip", "kind_of"]

Dimension: TypeAlias = tuple[int, int, int, int, int, int]
"""Exponents of metre, kilogram, second, ampere, kelvin, mole."""


class Slip(NamedTuple):
    """A likely slip: a value between `low` and `high` was meant in another unit.

    Parameters
    ----------
    low, high : float
        The SI values that point to the slip.
    unit : str
        The unit that was probably meant.
    factor : float
        SI value of one such unit.
    text : str
        What to say where no factor leads to the right value.
    """

    low: float
    high: float
    unit: str = ""
    factor: float = 1.0
    text: str = ""

    def hint(self, value: float, si: str) -> str:
        """What was probably meant by `value` [SI]."""
        if self.text:
            return self.text
        return f"{value:g} {self.unit} was probably meant, which is {value * self.factor:g} {si}".rstrip()


@dataclass(frozen=True, slots=True, eq=False)
class Kind:
    """One kind of quantity: its dimension, units, domain and plausible size.

    Parameters
    ----------
    name : str
        The kind, such as ``"viscosity"``.
    dimension : tuple of int
        Exponents of metre, kilogram, second, ampere, kelvin, mole.
    si, stock : str
        Unit of bare numbers and unit of results, both readable by pint.
    per_stock : float
        SI value of one stock unit.
    domain : str
        What a value must satisfy unless a function says otherwise.
    plausible : (float, float) or None
        Limits [SI] that no liquid or device passes.
    slips : tuple of Slip
        Likely slips outside those limits.
    accepts : frozenset of str
        Marks of special units that it takes: ``"gauge"`` pressures, ``"mass"`` percent ...
    zero : float
        SI value at zero of the stock unit.
    words : str
        How an error calls it.
    """

    name: str
    dimension: Dimension
    si: str
    stock: str
    per_stock: float
    domain: Domain = "> 0"
    plausible: tuple[float, float] | None = None
    slips: tuple[Slip, ...] = ()
    accepts: frozenset[str] = frozenset()
    zero: float = 0.0
    words: str = ""

    @property
    def plain(self) -> bool:
        """True where results stay plain numbers: everything without a unit."""
        return self.si == ""


ZERO_CELSIUS: Final = 273.15
STANDARD_ATMOSPHERE: Final = 101325.0

NONE: Final[Dimension] = (0, 0, 0, 0, 0, 0)
LENGTH: Final[Dimension] = (1, 0, 0, 0, 0, 0)
AREA: Final[Dimension] = (2, 0, 0, 0, 0, 0)
VOLUME: Final[Dimension] = (3, 0, 0, 0, 0, 0)
MASS: Final[Dimension] = (0, 1, 0, 0, 0, 0)
TIME: Final[Dimension] = (0, 0, 1, 0, 0, 0)
RATE: Final[Dimension] = (0, 0, -1, 0, 0, 0)
TEMPERATURE: Final[Dimension] = (0, 0, 0, 0, 1, 0)
AMOUNT: Final[Dimension] = (0, 0, 0, 0, 0, 1)
FORCE: Final[Dimension] = (1, 1, -2, 0, 0, 0)
PRESSURE: Final[Dimension] = (-1, 1, -2, 0, 0, 0)
ENERGY: Final[Dimension] = (2, 1, -2, 0, 0, 0)
POWER: Final[Dimension] = (2, 1, -3, 0, 0, 0)
VISCOSITY: Final[Dimension] = (-1, 1, -1, 0, 0, 0)
DIFFUSIVITY: Final[Dimension] = (2, 0, -1, 0, 0, 0)
FLOW: Final[Dimension] = (3, 0, -1, 0, 0, 0)
CURRENT: Final[Dimension] = (0, 0, 0, 1, 0, 0)
CHARGE: Final[Dimension] = (0, 0, 1, 1, 0, 0)
VOLTAGE: Final[Dimension] = (2, 1, -3, -1, 0, 0)


def _kinds(*kinds: Kind) -> dict[str, Kind]:
    return {kind.name: kind for kind in kinds}


def _marks(*marks: str) -> frozenset[str]:
    return frozenset(marks)


# Windows run from liquefied light hydrocarbons to molten metals. They are practice limits
# of this project, set by judgement, not data: `plausible=False` lets anything pass.
KINDS: Final[dict[str, Kind]] = _kinds(
    Kind("ratio", NONE, "", "", 1.0, "any", accepts=_marks("percent", "mass", "mole", "volume"),
         words="a pure number"),
    Kind("fraction", NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _marks("percent", "mass", "mole", "volume", "brix"), words="a fraction"),
    Kind("mass_fraction", NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _marks("percent", "mass", "brix"), words="a mass fraction"),
    Kind("mole_fraction", NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _marks("percent", "mole"), words="a mole fraction"),
    Kind("volume_fraction", NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _marks("percent", "volume"), words="a volume fraction"),
    Kind("humidity", NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _marks("percent", "humidity"), words="a relative humidity"),
    Kind("static_permittivity", NONE, "", "", 1.0, "> 0", (1.0, 400.0),
         words="a relative static permittivity"),
    Kind("refractive_index", NONE, "", "", 1.0, "> 0", (1.0, 4.0), words="a refractive index"),
    Kind("angle", NONE, "rad", "degree", math.pi / 180, "any", (-6.5, 6.5),
         (Slip(6.5, 360.0, "deg", math.pi / 180),), _marks("angle"), words="an angle"),
    Kind("density", (-3, 1, 0, 0, 0, 0), "kg/m^3", "kg/m^3", 1.0, "> 0", (50.0, 2.5e4),
         (Slip(0.2, 25.0, "g/cm3", 1000.0),), words="a density"),
    Kind("viscosity", VISCOSITY, "Pa*s", "mPa*s", 1e-3, "> 0", (1e-5, 1e3),
         (Slip(1e-9, 1e-5, text="This looks like a kinematic viscosity in m2/s; multiply it by the "
               "density"),
          Slip(1e3, 1e7, "mPa*s", 1e-3)), words="a dynamic viscosity"),
    Kind("gas_viscosity", VISCOSITY, "Pa*s", "uPa*s", 1e-6, "> 0", (1e-7, 1e-3),
         (Slip(1.0, 1e3, "uPa*s", 1e-6),), words="a dynamic viscosity"),
    Kind("kinematic_viscosity", DIFFUSIVITY, "m^2/s", "mm^2/s", 1e-6, "> 0", (1e-8, 0.2),
         (Slip(0.2, 1e6, "cSt", 1e-6),), words="a kinematic viscosity"),
    Kind("diffusivity", DIFFUSIVITY, "m^2/s", "mm^2/s", 1e-6, "> 0", (1e-14, 5e-3),
         (Slip(5e-3, 1.0, "cm2/s", 1e-4), Slip(1.0, 1e3, "mm2/s", 1e-6)), words="a diffusivity"),
    Kind("surface_tension", (0, 1, -2, 0, 0, 0), "N/m", "mN/m", 1e-3, "> 0", (1e-7, 4.0),
         (Slip(4.0, 5e3, "mN/m", 1e-3),), words="a surface tension"),
    Kind("surface_tension_slope", (0, 1, -2, 0, -1, 0), "N/(m*K)", "mN/(m*K)", 1e-3, "any",
         (-0.02, 0.02), (Slip(-20.0, -0.02, "mN/(m*K)", 1e-3), Slip(0.02, 20.0, "mN/(m*K)", 1e-3)),
         words="a change of surface tension with temperature"),
    Kind("absolute_pressure", PRESSURE, "Pa", "kPa", 1e3, "> 0", None, (),
         _marks("absolute"), words="an absolute pressure"),
    Kind("gauge_pressure", PRESSURE, "Pa", "kPa", 1e3, "any", None, (), _marks("gauge"),
         words="a gauge pressure"),
    Kind("either_pressure", PRESSURE, "Pa", "kPa", 1e3, "> 0", None, (),
         _marks("absolute", "gauge"), words="an absolute pressure"),
    Kind("pressure", PRESSURE, "Pa", "kPa", 1e3, "any", words="a pressure difference"),
    Kind("vapour_pressure", PRESSURE, "Pa", "kPa", 1e3, "> 0", (0.0, 5e7), (),
         _marks("absolute"), words="a vapour pressure"),
    Kind("stress", PRESSURE, "Pa", "Pa", 1.0, ">= 0", words="a stress"),
    Kind("heat_of_vaporisation", (2, 0, -2, 0, 0, 0), "J/kg", "kJ/kg", 1e3, "> 0", (1e4, 5e7),
         (Slip(10.0, 1e4, "kJ/kg", 1e3),), words="a heat of vaporisation by mass"),
    Kind("heat_capacity", (2, 0, -2, 0, -1, 0), "J/(kg*K)", "J/(kg*K)", 1.0, "> 0", (50.0, 2e4),
         (Slip(0.05, 20.0, "kJ/(kg*K)", 1e3),), words="a heat capacity by mass"),
    Kind("thermal_conductivity", (1, 1, -3, 0, -1, 0), "W/(m*K)", "W/(m*K)", 1.0, "> 0",
         (1e-3, 250.0), (Slip(250.0, 1e4, "mW/(m*K)", 1e-3),), words="a thermal conductivity"),
    Kind("heat_transfer_coefficient", (0, 1, -3, 0, -1, 0), "W/(m^2*K)", "W/(m^2*K)", 1.0,
         words="a heat transfer coefficient"),
    Kind("mass_transfer_coefficient", (1, 0, -1, 0, 0, 0), "m/s", "mm/s", 1e-3,
         words="a mass transfer coefficient"),
    Kind("thermal_expansion", (0, 0, 0, 0, -1, 0), "1/K", "1/K", 1.0, "any", (-0.05, 0.05),
         words="a thermal expansion coefficient"),
    Kind("speed_of_sound", (1, 0, -1, 0, 0, 0), "m/s", "m/s", 1.0, "> 0", (50.0, 1e4),
         (Slip(0.05, 10.0, "km/s", 1e3),), words="a speed of sound"),
    Kind("electrical_conductivity", (-3, -1, 3, 2, 0, 0), "S/m", "uS/cm", 1e-4, ">= 0",
         (0.0, 5e7), words="an electrical conductivity"),
    Kind("temperature", TEMPERATURE, "K", "degC", 1.0, "> 0", (2.0, 7e3), (),
         _marks("temperature"), ZERO_CELSIUS, words="a temperature"),
    Kind("temperature_difference", TEMPERATURE, "K", "K", 1.0, "any", None, (),
         _marks("difference"), words="a temperature difference"),
    Kind("velocity", (1, 0, -1, 0, 0, 0), "m/s", "m/s", 1.0, "any", (-1e4, 1e4),
         words="a velocity"),
    Kind("acceleration", (1, 0, -2, 0, 0, 0), "m/s^2", "m/s^2", 1.0, "any",
         words="an acceleration"),
    Kind("length", LENGTH, "m", "um", 1e-6, "> 0", (1e-10, 0.5), (Slip(0.5, 1e5, "um", 1e-6),),
         _marks("needle"), words="a length"),
    Kind("radius", LENGTH, "m", "um", 1e-6, "> 0", (1e-10, 0.5), (Slip(0.5, 1e5, "um", 1e-6),),
         words="a radius"),
    Kind("distance", LENGTH, "m", "mm", 1e-3, "> 0", (1e-10, 1e3), words="a distance"),
    Kind("mean_free_path", LENGTH, "m", "nm", 1e-9, "> 0", (1e-11, 1e3),
         words="a mean free path"),
    Kind("pitch", LENGTH, "m", "um", 1e-6, "> 0", (1e-9, 0.5), (Slip(0.5, 1e5, "um", 1e-6),),
         _marks("dpi"), words="a pitch"),
    Kind("resolution", (-1, 0, 0, 0, 0, 0), "1/m", "1/mm", 1e3, "> 0", None, (),
         _marks("dpi"), words="a number of dots per length"),
    Kind("wavenumber", (-1, 0, 0, 0, 0, 0), "1/m", "1/mm", 1e3, words="a wavenumber"),
    Kind("area", AREA, "m^2", "mm^2", 1e-6, words="an area"),
    Kind("grammage", (-2, 1, 0, 0, 0, 0), "kg/m^2", "g/m^2", 1e-3, words="a mass per area"),
    Kind("volume", VOLUME, "m^3", "pL", 1e-15, words="a volume"),
    Kind("mass", MASS, "kg", "ng", 1e-12, words="a mass"),
    Kind("amount", AMOUNT, "mol", "mol", 1.0, words="an amount of substance"),
    Kind("molar_mass", (0, 1, 0, 0, 0, -1), "kg/mol", "g/mol", 1e-3, "> 0", (1e-3, 10.0),
         (Slip(10.0, 5e3, "g/mol", 1e-3),), words="a molar mass"),
    Kind("mass_concentration", (-3, 1, 0, 0, 0, 0), "kg/m^3", "g/L", 1.0,
         words="a mass concentration"),
    Kind("molar_concentration", (-3, 0, 0, 0, 0, 1), "mol/m^3", "mmol/L", 1.0, ">= 0",
         words="a molar concentration"),
    Kind("intrinsic_viscosity", (3, -1, 0, 0, 0, 0), "m^3/kg", "mL/g", 1e-3, "> 0", (5e-4, 100.0),
         (Slip(100.0, 1e5, "mL/g", 1e-3),), words="an intrinsic viscosity"),
    Kind("frequency", RATE, "Hz", "kHz", 1e3, "> 0", (1e-6, 1e10), (),
         _marks("cycle", "angular"), words="a frequency"),
    Kind("shear_rate", RATE, "1/s", "1/s", 1.0, ">= 0", words="a shear rate"),
    Kind("growth_rate", RATE, "1/s", "1/s", 1.0, "any", words="a growth rate"),
    Kind("time", TIME, "s", "us", 1e-6, "> 0", words="a time"),
    Kind("duration", TIME, "s", "s", 1.0, "> 0", words="a time"),
    Kind("flow", FLOW, "m^3/s", "mL/min", 1e-6 / 60, "> 0", (1e-22, 10.0),
         words="a volume flow"),
    Kind("mass_flow", (0, 1, -1, 0, 0, 0), "kg/s", "g/min", 1e-3 / 60, "> 0", (1e-19, 1e4),
         words="a mass flow"),
    Kind("force", FORCE, "N", "mN", 1e-3, "any", words="a force"),
    Kind("energy", ENERGY, "J", "nJ", 1e-9, "any", words="an energy"),
    Kind("power", POWER, "W", "W", 1.0, "any", words="a power"),
    Kind("charge", CHARGE, "coulomb", "pC", 1e-12, "any", words="a charge"),
    Kind("specific_charge", (0, -1, 1, 1, 0, 0), "C/kg", "uC/g", 1e-3, "any",
         words="a charge by mass"),
    Kind("current", CURRENT, "A", "uA", 1e-6, "any", words="a current"),
    Kind("electric_field", (1, 1, -3, -1, 0, 0), "V/m", "kV/cm", 1e5, "any",
         words="an electric field"),
    Kind("voltage", VOLTAGE, "V", "V", 1.0, "any", words="a voltage"),
)  # fmt: skip

# Argument word -> kind. One name per thing in the whole library; docs/nomenclature.md
# gives symbols and meanings, and a test keeps the two together.
NOMENCLATURE: Final[dict[str, str]] = {
    "absolute_pressure": "absolute_pressure",
    "ambient_pressure": "absolute_pressure",
    "amplitude": "length",
    "angle": "angle",
    "area": "area",
    "breakup_length": "distance",
    "charge": "charge",
    "contact_angle": "angle",
    "current": "current",
    "density": "density",
    "diameter": "length",
    "diffusivity": "diffusivity",
    "diffusivity_in_air": "diffusivity",
    "distance": "distance",
    "drop_diameter": "length",
    "elastic_modulus": "stress",
    "electric_field": "electric_field",
    "electrical_conductivity": "electrical_conductivity",
    "evaporation_constant": "diffusivity",
    "flow": "flow",
    "frequency": "frequency",
    "gas_density": "density",
    "gas_viscosity": "gas_viscosity",
    "gauge_pressure": "gauge_pressure",
    "grammage": "grammage",
    "gravity": "acceleration",
    "growth_rate": "growth_rate",
    "heat_capacity": "heat_capacity",
    "heat_of_vaporisation": "heat_of_vaporisation",
    "heat_transfer_coefficient": "heat_transfer_coefficient",
    "height": "distance",
    "humidity": "humidity",
    "interfacial_tension": "surface_tension",
    "jet_diameter": "length",
    "kinematic_viscosity": "kinematic_viscosity",
    "length": "length",
    "mass": "mass",
    "mass_flow": "mass_flow",
    "mass_fraction": "mass_fraction",
    "mass_transfer_coefficient": "mass_transfer_coefficient",
    "mean_free_path": "mean_free_path",
    "molar_mass": "molar_mass",
    "mole_fraction": "mole_fraction",
    "nozzle_diameter": "length",
    "nozzle_length": "length",
    "outer_density": "density",
    "outer_diameter": "length",
    "outer_viscosity": "viscosity",
    "pitch": "pitch",
    "power": "power",
    "pressure": "pressure",
    "pressure_amplitude": "pressure",
    "pressure_drop": "pressure",
    "radius": "radius",
    "radius_amplitude": "length",
    "refractive_index": "refractive_index",
    "relaxation_time": "time",
    "resolution": "resolution",
    "shear_rate": "shear_rate",
    "solvent_viscosity": "viscosity",
    "specific_charge": "specific_charge",
    "speed_of_sound": "speed_of_sound",
    "static_permittivity": "static_permittivity",
    "surface_tension": "surface_tension",
    "surface_tension_slope": "surface_tension_slope",
    "temperature": "temperature",
    "temperature_difference": "temperature_difference",
    "thermal_conductivity": "thermal_conductivity",
    "thermal_diffusivity": "diffusivity",
    "thermal_expansion": "thermal_expansion",
    "thickness": "length",
    "time": "time",
    "tip_diameter": "length",
    "vapour_pressure": "vapour_pressure",
    "velocity": "velocity",
    "velocity_amplitude": "velocity",
    "viscosity": "viscosity",
    "voltage": "voltage",
    "volume": "volume",
    "volume_fraction": "volume_fraction",
    "wavelength": "length",
    "wavenumber": "wavenumber",
    "yield_stress": "stress",
}


_DOMAINS: Final[dict[str, Domain]] = {
    "> 0": "> 0", ">= 0": ">= 0", "0..1": "0..1", "any": "any",
}  # fmt: skip


@lru_cache(maxsize=1024)
def kind_of(text: str) -> tuple[Kind, Domain]:
    """The kind and domain behind ``"velocity"``, ``"velocity > 0"`` or an argument word.

    Parameters
    ----------
    text : str
        Name of a kind or an argument word, either with a domain behind it.

    Returns
    -------
    tuple of Kind and str
        The kind and the domain: its own unless the text says otherwise.

    Raises
    ------
    BadInput
        For an unknown name or domain.

    Examples
    --------
    >>> kind_of("gas_density")[0].name
    'density'
    >>> kind_of("velocity > 0")[1]
    '> 0'
    """
    name, *rest = text.split(maxsplit=1) or [""]
    kind = KINDS.get(name) or KINDS.get(NOMENCLATURE.get(name, ""))
    if kind is None:
        raise BadInput(
            f"no kind of quantity is called {name!r}",
            choices=nearest(name, [*KINDS, *NOMENCLATURE]),
        )
    if not rest:
        return kind, kind.domain
    domain = _DOMAINS.get(rest[0].strip())
    if domain is None:
        raise BadInput(f"domain {rest[0]!r} is not known", allowed=", ".join(_DOMAINS))
    return kind, domain
