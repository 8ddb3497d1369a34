"""Trade units: exact factors, dimensions, and what each of them may stand for.

Factors are fractions, so that "60 um" is 60e-6 to the last bit. A mark binds a unit to the
kinds that accept it: revolutions are no shear rate, per cent by mass is no mole fraction.
Pint is asked only for words that are missing here.
"""

from __future__ import annotations

import math
from fractions import Fraction
from typing import Final, NamedTuple

from dropkit.unit_table import (
    AMOUNT,
    CHARGE,
    CURRENT,
    DIFFUSIVITY,
    ENERGY,
    FLOW,
    FORCE,
    LENGTH,
    MASS,
    NONE,
    POWER,
    PRESSURE,
    RATE,
    TEMPERATURE,
    TIME,
    VISCOSITY,
    VOLTAGE,
    VOLUME,
    Dimension,
)

__all__ = [
    "NEEDLE_GAUGES",
    "NEEDLE_WORDS",
    "PREFIXED",
    "PREFIXES",
    "REFUSED",
    "SINGLE",
    "WHOLE",
    "Unit",
]


class Unit(NamedTuple):
    """A unit: SI value = value * factor + zero; a mark limits it to kinds that accept it."""

    factor: Fraction
    dimension: Dimension
    mark: str = ""
    zero: Fraction = Fraction(0)


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
    "m": (Unit(Fraction(1), LENGTH), "meter"),
    "g": (Unit(_MILLI, MASS), "gram"),
    "s": (Unit(Fraction(1), TIME), "second"),
    "A": (Unit(Fraction(1), CURRENT), "ampere"),
    "K": (Unit(Fraction(1), TEMPERATURE), "kelvin"),
    "mol": (Unit(Fraction(1), AMOUNT), "mole"),
    "L": (Unit(_MILLI, VOLUME), "liter"),
    "l": (Unit(_MILLI, VOLUME), "liter"),
    "N": (Unit(Fraction(1), FORCE), "newton"),
    "Pa": (Unit(Fraction(1), PRESSURE), "pascal"),
    "J": (Unit(Fraction(1), ENERGY), "joule"),
    "W": (Unit(Fraction(1), POWER), "watt"),
    "C": (Unit(Fraction(1), CHARGE), "coulomb"),
    "V": (Unit(Fraction(1), VOLTAGE), "volt"),
    "S": (Unit(Fraction(1), (-2, -1, 3, 2, 0, 0)), "siemens"),
    "F": (Unit(Fraction(1), (-2, -1, 4, 2, 0, 0)), "farad"),
    "Hz": (Unit(Fraction(1), RATE), "hertz"),
    "P": (Unit(Fraction(1, 10), VISCOSITY), "poise"),
    "St": (Unit(Fraction(1, 10000), DIFFUSIVITY), "stokes"),
    "Pas": (Unit(Fraction(1), VISCOSITY), ""),
    "bar": (Unit(Fraction(100000), PRESSURE), "bar"),
    # Named for a mass, but polymers are sold by it: the molar mass of one such unit.
    "Da": (Unit(_MILLI, (0, 1, 0, 0, 0, -1)), ""),
    "ohm": (Unit(Fraction(1), (2, 1, -3, -2, 0, 0)), "ohm"),
}

# Units without prefixes; they win over a prefix and a unit ("min" is no milli-inch).
SINGLE: Final[dict[str, tuple[Unit, str]]] = {
    "min": (Unit(Fraction(60), TIME), "minute"),
    "h": (Unit(Fraction(3600), TIME), "hour"),
    "hr": (Unit(Fraction(3600), TIME), "hour"),
    "sec": (Unit(Fraction(1), TIME), "second"),
    "in": (Unit(_INCH, LENGTH), "inch"),
    "inch": (Unit(_INCH, LENGTH), "inch"),
    "ft": (Unit(12 * _INCH, LENGTH), "foot"),
    "fpm": (Unit(12 * _INCH / 60, (1, 0, -1, 0, 0, 0)), ""),
    "mil": (Unit(_INCH / 1000, LENGTH), "thou"),
    "mils": (Unit(_INCH / 1000, LENGTH), "thou"),
    "thou": (Unit(_INCH / 1000, LENGTH), "thou"),
    "micron": (Unit(Fraction(1, 10**6), LENGTH), "micrometer"),
    "microns": (Unit(Fraction(1, 10**6), LENGTH), "micrometer"),
    "Å": (Unit(Fraction(1, 10**10), LENGTH), "angstrom"),
    "angstrom": (Unit(Fraction(1, 10**10), LENGTH), "angstrom"),
    "cc": (Unit(Fraction(1, 10**6), VOLUME), ""),
    "cp": (Unit(_MILLI, VISCOSITY), "centipoise"),  # pint has a cup here
    "cps": (Unit(_MILLI, VISCOSITY), "centipoise"),
    "cPs": (Unit(_MILLI, VISCOSITY), "centipoise"),
    "dyn": (Unit(Fraction(1, 10**5), FORCE), "dyne"),
    "dyne": (Unit(Fraction(1, 10**5), FORCE), "dyne"),
    "dynes": (Unit(Fraction(1, 10**5), FORCE), "dyne"),
    "erg": (Unit(Fraction(1, 10**7), ENERGY), "erg"),
    "lb": (Unit(_POUND, MASS), "pound"),
    "lbf": (Unit(_POUND * _GRAVITY, FORCE), "force_pound"),
    "t": (Unit(Fraction(1000), MASS), "metric_ton"),
    "psi": (Unit(_PSI, PRESSURE), ""),
    "atm": (Unit(Fraction(101325), PRESSURE), ""),
    "Torr": (Unit(Fraction(101325, 760), PRESSURE), ""),
    "torr": (Unit(Fraction(101325, 760), PRESSURE), ""),
    "mmHg": (Unit(_MERCURY_METRE / 1000, PRESSURE), ""),
    "inHg": (Unit(_MERCURY_METRE * _INCH, PRESSURE), ""),
    "mmH2O": (Unit(_WATER_METRE / 1000, PRESSURE), ""),
    "cmH2O": (Unit(_WATER_METRE / 100, PRESSURE), ""),
    "inH2O": (Unit(_WATER_METRE * _INCH, PRESSURE), ""),
    "lpm": (Unit(_MILLI / 60, FLOW), ""),
    "LPM": (Unit(_MILLI / 60, FLOW), ""),
    "gpm": (Unit(_US_GALLON / 60, FLOW), ""),
    "US_gal": (Unit(_US_GALLON, VOLUME), ""),
    "imp_gal": (Unit(_IMPERIAL_GALLON, VOLUME), ""),
    "gsm": (Unit(_MILLI, (-2, 1, 0, 0, 0, 0)), ""),
    "rad": (Unit(Fraction(1), NONE), "radian"),
    "deg": (Unit(_PI / 180, NONE), "degree"),
    "degree": (Unit(_PI / 180, NONE), "degree"),
    # Inside a compound unit a degree is a difference: W/(m*degC).
    "degC": (Unit(Fraction(1), TEMPERATURE), "degree_Celsius"),
    "degF": (Unit(Fraction(5, 9), TEMPERATURE), "degree_Fahrenheit"),
    "°C": (Unit(Fraction(1), TEMPERATURE), "degree_Celsius"),
    "°F": (Unit(Fraction(5, 9), TEMPERATURE), "degree_Fahrenheit"),
}

_CELSIUS: Final = Unit(Fraction(1), TEMPERATURE, "temperature", Fraction(27315, 100))
_FAHRENHEIT: Final = Unit(
    Fraction(5, 9), TEMPERATURE, "temperature", Fraction(45967, 100) * Fraction(5, 9)
)
_RANKINE: Final = Unit(Fraction(5, 9), TEMPERATURE, "temperature")
_CYCLES_PER_MINUTE: Final = Unit(Fraction(1, 60), RATE, "cycle")


def _percent(mark: str) -> Unit:
    return Unit(Fraction(1, 100), NONE, mark)


# Whole units, tried before anything is taken apart; a mark binds them to kinds.
WHOLE: Final[dict[str, Unit]] = {
    **dict.fromkeys(("°C", "° C", "degC", "deg C", "deg. C", "degrees C", "deg_C", "degree_Celsius", "celsius", "Celsius"),
                    _CELSIUS),
    **dict.fromkeys(("°F", "° F", "degF", "deg F", "deg. F", "degrees F", "deg_F", "degree_Fahrenheit", "fahrenheit",
                     "Fahrenheit"), _FAHRENHEIT),
    **dict.fromkeys(("degR", "°R", "deg R"), _RANKINE),
    **dict.fromkeys(("delta_degC", "delta_degree_Celsius", "Δ°C"), Unit(Fraction(1), TEMPERATURE, "difference")),
    **dict.fromkeys(("delta_degF", "delta_degree_Fahrenheit", "Δ°F"), Unit(Fraction(5, 9), TEMPERATURE, "difference")),
    **dict.fromkeys(("rpm", "rev/min", "r/min", "RPM"), _CYCLES_PER_MINUTE),
    **dict.fromkeys(("rev/s", "rps"), Unit(Fraction(1), RATE, "cycle")),
    "rad": Unit(Fraction(1), NONE, "angle"),
    **dict.fromkeys(("deg", "°", "degree", "degrees"), Unit(_PI / 180, NONE, "angle")),
    "rad/s": Unit(1 / (2 * _PI), RATE, "angular"),
    "dpi": Unit(1 / _INCH, (-1, 0, 0, 0, 0, 0), "dpi"),
    "ppm": Unit(Fraction(1, 10**6), NONE, "percent"),
    **dict.fromkeys(("mm Hg", "mm_Hg"), SINGLE["mmHg"][0]),
    **dict.fromkeys(("in Hg",), SINGLE["inHg"][0]),
    **dict.fromkeys(("mm H2O", "mmWC"), SINGLE["mmH2O"][0]),
    **dict.fromkeys(("cm H2O", "cmWC"), SINGLE["cmH2O"][0]),
    **dict.fromkeys(("in H2O", "inWC", "in WC"), SINGLE["inH2O"][0]),
    "PSI": SINGLE["psi"][0],
    "PSIG": SINGLE["psi"][0]._replace(mark="gauge"),
    "PSIA": SINGLE["psi"][0]._replace(mark="absolute"),
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
            WHOLE[_form] = Unit(_factor, PRESSURE, _mark)

NEEDLE_WORDS: Final = frozenset({"-gauge", "G", "Ga", "ga", "gauge", "Gauge", "gage"})

# Nominal inner diameter [um] of regular-wall hypodermic tubing by gauge number, as in the
# Wikipedia article "Needle gauge comparison chart" and a copy of it (en.wikipedia.org,
# freebooknotes.com); both were seen up to number 31, so that higher numbers are refused. The
# table of ISO 9626 itself was not seen; it sets outer diameters and the smallest bore
# [from memory], so a bought needle can differ by several per cent, a thin-wall one by more.
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
    # Small letters: pint has Boltzmann's constant and the speed of light here.
    "k": "'K' for kelvin; before a unit k is 10^3",
    "c": "'degC' for degrees Celsius; before a unit c is 1/100",
    "f": "'degF' for degrees Fahrenheit; before a unit f is 10^-15",
    "M": "'mol/L' for a molar concentration, 'm' for metres; as a prefix M is 10^6",
    "u": "'um' for micrometres; 1 micron is 1 um",
    "oz": "'g' for a mass (1 ounce is 28.35 g), 'mL' for a volume (1 US fluid ounce is 29.57 mL)",
    "gal": "'US_gal' (3.785 L) or 'imp_gal' (4.546 L); 'gpm' is US gallons per minute",
}
