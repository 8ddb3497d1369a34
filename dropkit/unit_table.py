"""What quantities dropkit knows: kinds, the words that stand for them, and trade units.

Everything here is data: exact factors (as fractions), dimensions, stock units, domains,
plausibility windows with the slips that are likely behind a value outside them. How text
is read with it stands in :mod:`dropkit.units`.
"""

from __future__ import annotations

import math
from dataclasses import dataclass
from fractions import Fraction
from typing import Final, NamedTuple, TypeAlias

from dropkit.validity import Domain

__all__ = ["KINDS", "NEEDLE_GAUGES", "NOMENCLATURE", "Kind", "Slip"]

Dimension: TypeAlias = tuple[int, int, int, int, int, int]
"""Exponents of metre, kilogram, second, ampere, kelvin, mole."""


class Slip(NamedTuple):
    """A likely slip: a bare value between `low` and `high` was meant in `unit`.

    Parameters
    ----------
    low, high : float
        The SI values that point to the slip.
    unit : str
        The unit that was probably meant, readable by the parser.
    factor : float
        SI value of one such unit.
    zero : float
        SI value at zero of that unit.
    """

    low: float
    high: float
    unit: str
    factor: float
    zero: float = 0.0


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


class Unit(NamedTuple):
    """A unit: SI value = value * factor + zero; a mark limits it to kinds that accept it."""

    factor: Fraction
    dimension: Dimension
    mark: str = ""
    zero: Fraction = Fraction(0)


_NONE: Final = (0, 0, 0, 0, 0, 0)
_LENGTH: Final = (1, 0, 0, 0, 0, 0)
_AREA: Final = (2, 0, 0, 0, 0, 0)
_VOLUME: Final = (3, 0, 0, 0, 0, 0)
_MASS: Final = (0, 1, 0, 0, 0, 0)
_TIME: Final = (0, 0, 1, 0, 0, 0)
_RATE: Final = (0, 0, -1, 0, 0, 0)
_TEMPERATURE: Final = (0, 0, 0, 0, 1, 0)
_AMOUNT: Final = (0, 0, 0, 0, 0, 1)
_FORCE: Final = (1, 1, -2, 0, 0, 0)
_PRESSURE: Final = (-1, 1, -2, 0, 0, 0)
_ENERGY: Final = (2, 1, -2, 0, 0, 0)
_POWER: Final = (2, 1, -3, 0, 0, 0)
_VISCOSITY: Final = (-1, 1, -1, 0, 0, 0)
_DIFFUSIVITY: Final = (2, 0, -1, 0, 0, 0)
_FLOW: Final = (3, 0, -1, 0, 0, 0)
_CURRENT: Final = (0, 0, 0, 1, 0, 0)
_CHARGE: Final = (0, 0, 1, 1, 0, 0)
_VOLTAGE: Final = (2, 1, -3, -1, 0, 0)

ZERO_CELSIUS: Final = 273.15
STANDARD_ATMOSPHERE: Final = 101325.0


def _kinds(*kinds: Kind) -> dict[str, Kind]:
    return {kind.name: kind for kind in kinds}


def _accepts(*marks: str) -> frozenset[str]:
    return frozenset(marks)


# Windows run from light hydrocarbons to molten metals and silicates' thin end; they are
# practice limits of this project, not data: `plausible=False` lets anything pass.
KINDS: Final[dict[str, Kind]] = _kinds(
    Kind("ratio", _NONE, "", "", 1.0, "any", accepts=_accepts("percent", "mass", "mole", "volume"),
         words="a pure number"),
    Kind("fraction", _NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _accepts("percent", "mass", "mole", "volume", "brix"), words="a fraction"),
    Kind("mass_fraction", _NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _accepts("percent", "mass", "brix"), words="a mass fraction"),
    Kind("mole_fraction", _NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _accepts("percent", "mole"), words="a mole fraction"),
    Kind("volume_fraction", _NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _accepts("percent", "volume"), words="a volume fraction"),
    Kind("humidity", _NONE, "", "", 1.0, "0..1", None, (Slip(1.0, 100.0, "%", 0.01),),
         _accepts("percent", "humidity"), words="a relative humidity"),
    Kind("static_permittivity", _NONE, "", "", 1.0, "> 0", (1.0, 400.0),
         words="a relative static permittivity"),
    Kind("refractive_index", _NONE, "", "", 1.0, "> 0", (1.0, 4.0), words="a refractive index"),
    Kind("angle", _NONE, "rad", "degree", math.pi / 180, "any", (-6.5, 6.5),
         (Slip(6.5, 360.0, "deg", math.pi / 180),), words="an angle"),
    Kind("density", (-3, 1, 0, 0, 0, 0), "kg/m^3", "kg/m^3", 1.0, "> 0", (50.0, 2.5e4),
         (Slip(0.2, 25.0, "g/cm3", 1000.0),), words="a density"),
    Kind("viscosity", _VISCOSITY, "Pa*s", "mPa*s", 1e-3, "> 0", (1e-5, 1e3),
         (Slip(1e-9, 1e-5, "m2/s (a kinematic viscosity; multiply it by the density)", 1.0),
          Slip(1e3, 1e7, "mPa*s", 1e-3)), words="a dynamic viscosity"),
    Kind("gas_viscosity", _VISCOSITY, "Pa*s", "uPa*s", 1e-6, "> 0", (1e-7, 1e-3),
         (Slip(1.0, 1e3, "uPa*s", 1e-6),), words="a dynamic viscosity"),
    Kind("kinematic_viscosity", _DIFFUSIVITY, "m^2/s", "mm^2/s", 1e-6, "> 0", (1e-8, 0.2),
         (Slip(0.2, 1e6, "cSt", 1e-6),), words="a kinematic viscosity"),
    Kind("diffusivity", _DIFFUSIVITY, "m^2/s", "mm^2/s", 1e-6, "> 0", (1e-14, 5e-3),
         (Slip(5e-3, 1.0, "cm2/s", 1e-4), Slip(1.0, 1e3, "mm2/s", 1e-6)), words="a diffusivity"),
    Kind("surface_tension", (0, 1, -2, 0, 0, 0), "N/m", "mN/m", 1e-3, "> 0", (1e-7, 4.0),
         (Slip(4.0, 5e3, "mN/m", 1e-3),), words="a surface tension"),
    Kind("surface_tension_slope", (0, 1, -2, 0, -1, 0), "N/(m*K)", "mN/(m*K)", 1e-3, "any",
         (-0.02, 0.02), (Slip(-20.0, -0.02, "mN/(m*K)", 1e-3), Slip(0.02, 20.0, "mN/(m*K)", 1e-3)),
         words="a change of surface tension with temperature"),
    Kind("absolute_pressure", _PRESSURE, "Pa", "kPa", 1e3, "> 0", None, (),
         _accepts("absolute"), words="an absolute pressure"),
    Kind("gauge_pressure", _PRESSURE, "Pa", "kPa", 1e3, "any", None, (), _accepts("gauge"),
         words="a gauge pressure"),
    Kind("either_pressure", _PRESSURE, "Pa", "kPa", 1e3, "> 0", None, (),
         _accepts("absolute", "gauge"), words="an absolute pressure"),
    Kind("pressure", _PRESSURE, "Pa", "kPa", 1e3, "any", words="a pressure difference"),
    Kind("vapour_pressure", _PRESSURE, "Pa", "kPa", 1e3, "> 0", (0.0, 5e7), (),
         _accepts("absolute"), words="a vapour pressure"),
    Kind("stress", _PRESSURE, "Pa", "Pa", 1.0, ">= 0", words="a stress"),
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
    Kind("temperature", _TEMPERATURE, "K", "degC", 1.0, "> 0", (2.0, 7e3), (),
         _accepts("temperature"), ZERO_CELSIUS, words="a temperature"),
    Kind("temperature_difference", _TEMPERATURE, "K", "K", 1.0, "any", None, (),
         _accepts("difference"), words="a temperature difference"),
    Kind("velocity", (1, 0, -1, 0, 0, 0), "m/s", "m/s", 1.0, "any", (-1e4, 1e4),
         words="a velocity"),
    Kind("acceleration", (1, 0, -2, 0, 0, 0), "m/s^2", "m/s^2", 1.0, "any",
         words="an acceleration"),
    Kind("length", _LENGTH, "m", "um", 1e-6, "> 0", (1e-10, 0.5), (Slip(0.5, 1e5, "um", 1e-6),),
         _accepts("needle"), words="a length"),
    Kind("radius", _LENGTH, "m", "um", 1e-6, "> 0", (1e-10, 0.5), (Slip(0.5, 1e5, "um", 1e-6),),
         words="a radius"),
    Kind("distance", _LENGTH, "m", "mm", 1e-3, "> 0", (1e-10, 1e3), words="a distance"),
    Kind("mean_free_path", _LENGTH, "m", "nm", 1e-9, "> 0", (1e-11, 1e3),
         words="a mean free path"),
    Kind("pitch", _LENGTH, "m", "um", 1e-6, "> 0", (1e-9, 0.5), (Slip(0.5, 1e5, "um", 1e-6),),
         _accepts("dpi"), words="a pitch"),
    Kind("resolution", (-1, 0, 0, 0, 0, 0), "1/m", "1/mm", 1e3, "> 0", None, (),
         _accepts("dpi"), words="a number of dots per length"),
    Kind("wavenumber", (-1, 0, 0, 0, 0, 0), "1/m", "1/mm", 1e3, words="a wavenumber"),
    Kind("area", _AREA, "m^2", "mm^2", 1e-6, words="an area"),
    Kind("grammage", (-2, 1, 0, 0, 0, 0), "kg/m^2", "g/m^2", 1e-3, words="a mass per area"),
    Kind("volume", _VOLUME, "m^3", "pL", 1e-15, words="a volume"),
    Kind("mass", _MASS, "kg", "ng", 1e-12, words="a mass"),
    Kind("amount", _AMOUNT, "mol", "mol", 1.0, words="an amount of substance"),
    Kind("molar_mass", (0, 1, 0, 0, 0, -1), "kg/mol", "g/mol", 1e-3, "> 0", (1e-3, 1e4),
         (Slip(1.0, 1e7, "g/mol", 1e-3),), words="a molar mass"),
    Kind("frequency", _RATE, "Hz", "kHz", 1e3, "> 0", (1e-6, 1e10), (),
         _accepts("cycle", "angular"), words="a frequency"),
    Kind("shear_rate", _RATE, "1/s", "1/s", 1.0, ">= 0", words="a shear rate"),
    Kind("growth_rate", _RATE, "1/s", "1/s", 1.0, "any", words="a growth rate"),
    Kind("time", _TIME, "s", "us", 1e-6, "> 0", words="a time"),
    Kind("duration", _TIME, "s", "s", 1.0, "> 0", words="a time"),
    Kind("flow", _FLOW, "m^3/s", "mL/min", 1e-6 / 60, "> 0", (1e-22, 10.0),
         words="a volume flow"),
    Kind("mass_flow", (0, 1, -1, 0, 0, 0), "kg/s", "g/min", 1e-3 / 60, "> 0", (1e-19, 1e4),
         words="a mass flow"),
    Kind("force", _FORCE, "N", "mN", 1e-3, "any", words="a force"),
    Kind("energy", _ENERGY, "J", "nJ", 1e-9, "any", words="an energy"),
    Kind("power", _POWER, "W", "W", 1.0, "any", words="a power"),
    Kind("charge", _CHARGE, "C", "pC", 1e-12, "any", words="a charge"),
    Kind("specific_charge", (0, -1, 1, 1, 0, 0), "C/kg", "uC/g", 1e-3, "any",
         words="a charge by mass"),
    Kind("current", _CURRENT, "A", "uA", 1e-6, "any", words="a current"),
    Kind("electric_field", (1, 1, -3, -1, 0, 0), "V/m", "kV/cm", 1e5, "any",
         words="an electric field"),
    Kind("voltage", _VOLTAGE, "V", "V", 1.0, "any", words="a voltage"),
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
    "pitch": "pitch",
    "power": "power",
    "pressure": "pressure",
    "pressure_drop": "pressure",
    "radius": "radius",
    "refractive_index": "refractive_index",
    "relaxation_time": "time",
    "resolution": "resolution",
    "shear_rate": "shear_rate",
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
    "vapour_pressure": "vapour_pressure",
    "velocity": "velocity",
    "viscosity": "viscosity",
    "voltage": "voltage",
    "volume": "volume",
    "volume_fraction": "volume_fraction",
    "wavelength": "length",
    "wavenumber": "wavenumber",
    "yield_stress": "stress",
}

PREFIXES: Final[dict[str, tuple[int, str]]] = {
    "f": (-15, "femto"),
    "p": (-12, "pico"),
    "n": (-9, "nano"),
    "u": (-6, "micro"),
    "m": (-3, "milli"),
    "c": (-2, "centi"),
    "d": (-1, "deci"),
    "h": (2, "hecto"),
    "k": (3, "kilo"),
    "M": (6, "mega"),
    "G": (9, "giga"),
}

_INCH: Final = Fraction(254, 10000)
_POUND: Final = Fraction(45359237, 100000000)  # exact: international pound
_GRAVITY: Final = Fraction(980665, 100000)  # exact: standard gravity
_PSI: Final = _POUND * _GRAVITY / _INCH**2
_US_GALLON: Final = 231 * _INCH**3
_IMPERIAL_GALLON: Final = Fraction(454609, 100000000)  # exact: UK definition
# Conventional columns: exactly 1000 and 13595.1 kg/m3 under standard gravity.
_WATER_METRE: Final = 1000 * _GRAVITY
_MERCURY_METRE: Final = Fraction(135951, 10) * _GRAVITY
_MILLI: Final = Fraction(1, 1000)
_PI: Final = Fraction(math.pi)

# Units that take prefixes, with pint's long name (results are labelled by it).
PREFIXED: Final[dict[str, tuple[Unit, str]]] = {
    "m": (Unit(Fraction(1), _LENGTH), "meter"),
    "g": (Unit(_MILLI, _MASS), "gram"),
    "s": (Unit(Fraction(1), _TIME), "second"),
    "A": (Unit(Fraction(1), _CURRENT), "ampere"),
    "K": (Unit(Fraction(1), _TEMPERATURE), "kelvin"),
    "mol": (Unit(Fraction(1), _AMOUNT), "mole"),
    "L": (Unit(_MILLI, _VOLUME), "liter"),
    "l": (Unit(_MILLI, _VOLUME), "liter"),
    "N": (Unit(Fraction(1), _FORCE), "newton"),
    "Pa": (Unit(Fraction(1), _PRESSURE), "pascal"),
    "J": (Unit(Fraction(1), _ENERGY), "joule"),
    "W": (Unit(Fraction(1), _POWER), "watt"),
    "C": (Unit(Fraction(1), _CHARGE), "coulomb"),
    "V": (Unit(Fraction(1), _VOLTAGE), "volt"),
    "S": (Unit(Fraction(1), (-2, -1, 3, 2, 0, 0)), "siemens"),
    "F": (Unit(Fraction(1), (-2, -1, 4, 2, 0, 0)), "farad"),
    "Hz": (Unit(Fraction(1), _RATE), "hertz"),
    "P": (Unit(Fraction(1, 10), _VISCOSITY), "poise"),
    "St": (Unit(Fraction(1, 10000), _DIFFUSIVITY), "stokes"),
    "Pas": (Unit(Fraction(1), _VISCOSITY), ""),
    "bar": (Unit(Fraction(100000), _PRESSURE), "bar"),
    "ohm": (Unit(Fraction(1), (2, 1, -3, -2, 0, 0)), "ohm"),
}

# Units without prefixes; they win over a prefix and a unit ("min" is no milli-inch).
SINGLE: Final[dict[str, tuple[Unit, str]]] = {
    "min": (Unit(Fraction(60), _TIME), "minute"),
    "h": (Unit(Fraction(3600), _TIME), "hour"),
    "hr": (Unit(Fraction(3600), _TIME), "hour"),
    "sec": (Unit(Fraction(1), _TIME), "second"),
    "in": (Unit(_INCH, _LENGTH), "inch"),
    "inch": (Unit(_INCH, _LENGTH), "inch"),
    "ft": (Unit(12 * _INCH, _LENGTH), "foot"),
    "mil": (Unit(_INCH / 1000, _LENGTH), "thou"),
    "mils": (Unit(_INCH / 1000, _LENGTH), "thou"),
    "thou": (Unit(_INCH / 1000, _LENGTH), "thou"),
    "micron": (Unit(Fraction(1, 10**6), _LENGTH), "micrometer"),
    "microns": (Unit(Fraction(1, 10**6), _LENGTH), "micrometer"),
    "cc": (Unit(Fraction(1, 10**6), _VOLUME), ""),
    "ccm": (Unit(Fraction(1, 10**6), _VOLUME), ""),
    "cps": (Unit(_MILLI, _VISCOSITY), "centipoise"),
    "dyn": (Unit(Fraction(1, 10**5), _FORCE), "dyne"),
    "dyne": (Unit(Fraction(1, 10**5), _FORCE), "dyne"),
    "dynes": (Unit(Fraction(1, 10**5), _FORCE), "dyne"),
    "lb": (Unit(_POUND, _MASS), "pound"),
    "lbf": (Unit(_POUND * _GRAVITY, _FORCE), "force_pound"),
    "t": (Unit(Fraction(1000), _MASS), "metric_ton"),
    "psi": (Unit(_PSI, _PRESSURE), ""),
    "atm": (Unit(Fraction(101325), _PRESSURE), ""),
    "Torr": (Unit(Fraction(101325, 760), _PRESSURE), ""),
    "torr": (Unit(Fraction(101325, 760), _PRESSURE), ""),
    "mmHg": (Unit(_MERCURY_METRE / 1000, _PRESSURE), ""),
    "inHg": (Unit(_MERCURY_METRE * _INCH, _PRESSURE), ""),
    "mmH2O": (Unit(_WATER_METRE / 1000, _PRESSURE), ""),
    "cmH2O": (Unit(_WATER_METRE / 100, _PRESSURE), ""),
    "inH2O": (Unit(_WATER_METRE * _INCH, _PRESSURE), ""),
    "gpm": (Unit(_US_GALLON / 60, _FLOW), ""),
    "US_gal": (Unit(_US_GALLON, _VOLUME), ""),
    "imp_gal": (Unit(_IMPERIAL_GALLON, _VOLUME), ""),
    "gsm": (Unit(_MILLI, (-2, 1, 0, 0, 0, 0)), ""),
    "rad": (Unit(Fraction(1), _NONE), "radian"),
    "deg": (Unit(_PI / 180, _NONE), "degree"),
    "degree": (Unit(_PI / 180, _NONE), "degree"),
    # Inside a compound unit a degree is a difference: W/(m*degC).
    "degC": (Unit(Fraction(1), _TEMPERATURE), "degree_Celsius"),
    "degF": (Unit(Fraction(5, 9), _TEMPERATURE), "degree_Fahrenheit"),
}

_CELSIUS: Final = Unit(Fraction(1), _TEMPERATURE, "temperature", Fraction(27315, 100))
_FAHRENHEIT: Final = Unit(
    Fraction(5, 9), _TEMPERATURE, "temperature", Fraction(45967, 100) * Fraction(5, 9)
)
_RANKINE: Final = Unit(Fraction(5, 9), _TEMPERATURE, "temperature")
_CYCLES_PER_MINUTE: Final = Unit(Fraction(1, 60), _RATE, "cycle")


def _percent(mark: str) -> Unit:
    return Unit(Fraction(1, 100), _NONE, mark)


# Whole units, tried before anything is taken apart; a mark binds them to kinds.
WHOLE: Final[dict[str, Unit]] = {
    **dict.fromkeys(("°C", "degC", "deg C", "deg_C", "degree_Celsius", "celsius", "Celsius"),
                    _CELSIUS),
    **dict.fromkeys(("°F", "degF", "deg F", "deg_F", "degree_Fahrenheit", "fahrenheit",
                     "Fahrenheit"), _FAHRENHEIT),
    **dict.fromkeys(("degR", "°R", "deg R"), _RANKINE),
    **dict.fromkeys(("delta_degC", "Δ°C"), Unit(Fraction(1), _TEMPERATURE, "difference")),
    **dict.fromkeys(("delta_degF", "Δ°F"), Unit(Fraction(5, 9), _TEMPERATURE, "difference")),
    **dict.fromkeys(("rpm", "rev/min", "r/min", "RPM"), _CYCLES_PER_MINUTE),
    **dict.fromkeys(("rev/s", "rps"), Unit(Fraction(1), _RATE, "cycle")),
    "rad/s": Unit(1 / (2 * _PI), _RATE, "angular"),
    "dpi": Unit(1 / _INCH, (-1, 0, 0, 0, 0, 0), "dpi"),
    "ppm": Unit(Fraction(1, 10**6), _NONE, "percent"),
    "%": _percent("percent"),
    **dict.fromkeys(("wt%", "wt %", "wt.%", "wt. %", "mass%", "mass %", "% w/w", "%w/w"),
                    _percent("mass")),
    **dict.fromkeys(("mol%", "mol %"), _percent("mole")),
    **dict.fromkeys(("vol%", "vol %", "vol.%", "% v/v", "%v/v"), _percent("volume")),
    **dict.fromkeys(("°Bx", "° Bx", "degBx", "deg Bx", "°Brix", "Bx", "Brix"), _percent("brix")),
    **dict.fromkeys(("%RH", "% RH", "% rh", "%rh"), _percent("humidity")),
}  # fmt: skip

for _name, _factor in (("bar", Fraction(100000)), ("mbar", Fraction(100)), ("psi", _PSI),
                       ("kPa", Fraction(1000)), ("MPa", Fraction(10**6)),
                       ("Pa", Fraction(1))):  # fmt: skip
    for _letter, _mark in (("g", "gauge"), ("a", "absolute")):
        for _form in (f"{_name}{_letter}", f"{_name}({_letter})", f"{_name} {_letter}",
                      f"{_name} ({_letter})", f"{_name}_{_letter}"):  # fmt: skip
            WHOLE[_form] = Unit(_factor, _PRESSURE, _mark)

NEEDLE_WORDS: Final = frozenset({"G", "Ga", "ga", "gauge", "Gauge", "gage"})

# Nominal inner diameter [um] of regular-wall hypodermic tubing by gauge number. Seen in two
# copies of a public "needle gauge comparison chart" (encyclopedia article, 2011-2013 state);
# the table of ISO 9626 itself was not seen. It fixes outer diameters and the smallest inner
# diameter allowed, so a bought needle may differ by several per cent and thin-wall ones by
# far more. Numbers above 31 were cut off in both copies and are refused.
NEEDLE_GAUGES: Final[dict[int, int]] = {
    7: 3810, 8: 3429, 9: 2997, 10: 2692, 11: 2388, 12: 2159, 13: 1803, 14: 1600,
    15: 1372, 16: 1194, 17: 1067, 18: 838, 19: 686, 20: 603, 21: 514, 22: 413,
    23: 337, 24: 311, 25: 260, 26: 260, 27: 210, 28: 184, 29: 184, 30: 159,
    31: 133,
}  # fmt: skip

# Unit text with several meanings: what to write instead.
REFUSED: Final[dict[str, str]] = {
    "C": "'degC' for degrees Celsius, 'coulomb' for a charge",
    "F": "'degF' for degrees Fahrenheit, 'farad' for a capacitance",
    "M": "'mol/L' for a molar concentration, 'm' for metres; as a prefix M is 10^6",
    "oz": "'g' for a mass (1 ounce is 28.35 g), 'mL' for a volume (1 US fluid ounce is 29.57 mL)",
    "gal": "'US_gal' (3.785 L) or 'imp_gal' (4.546 L); 'gpm' is US gallons per minute",
}
