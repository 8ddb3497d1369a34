"""Equations for humid air: SI floats or arrays in and out, no checks; `gas` puts them together.

``x`` is the mole fraction of water vapour. Dry air is taken with 400 ppm of carbon dioxide.
How each set of coefficients was seen stands in its source file; the agreement with other
formulations in ``docs/air.md``.
"""

from __future__ import annotations

from typing import Any, Final

import numpy as np

__all__ = [
    "DRY_AIR",
    "WATER",
    "compressibility",
    "dew_point",
    "enhancement_factor",
    "gas_density",
    "gas_heat_capacity",
    "gas_mean_free_path",
    "gas_thermal_conductivity",
    "gas_viscosity",
    "saturation_pressure",
    "water_diffusivity",
]

GAS_CONSTANT: Final = 8.314462618  # J/(mol K), exact in the SI of 2019
DRY_AIR: Final = 28.96546e-3  # kg/mol with 400 ppm CO2, Picard et al. 2008
WATER: Final = 18.01528e-3  # kg/mol
ZERO_CELSIUS: Final = 273.15
ATMOSPHERE: Final = 101325.0

# --- saturation ------------------------------------------------------------------------

# Hardy 1998, vapour pressure over liquid water, also supercooled; powers -2 to 4 and ln T.
_SATURATION: Final = (
    -2.8365744e3, -6.028076559e3, 1.954263612e1, -2.737830188e-2, 1.6261698e-5, 7.0229056e-10,
    -1.8680009e-13,
)  # fmt: skip
_SATURATION_LOG: Final = 2.7150305
# Hardy 1998, enhancement factor over liquid water: (alpha, beta) below and above 0 degC.
_COLD: Final = (
    (3.62183e-4, 2.6061244e-5, 3.8667770e-7, 3.8268958e-9),
    (-1.07604e1, 6.3987441e-2, -2.6351566e-4, 1.6725084e-6),
)
_WARM: Final = (
    (3.53624e-4, 2.9328363e-5, 2.6168979e-7, 8.5813609e-9),
    (-1.07588e1, 6.3268134e-2, -2.5368934e-4, 6.3405286e-7),
)


def _polynomial(z: Any, coefficients: tuple[float, ...]) -> Any:
    value: Any = coefficients[-1]
    for coefficient in coefficients[-2::-1]:
        value = value * z + coefficient
    return value


def saturation_pressure(temperature: Any) -> Any:
    """Vapour pressure of liquid water, by itself and without air [Pa]."""
    terms = _polynomial(temperature, _SATURATION) / (temperature * temperature)
    return np.exp(terms + _SATURATION_LOG * np.log(temperature))


def enhancement_factor(temperature: Any, pressure: Any) -> Any:
    """How much more water vapour saturated air holds than its own pressure gives; 1 when boiling."""
    t = temperature - ZERO_CELSIUS
    share = saturation_pressure(temperature) / pressure
    cold = t < 0.0
    alpha = np.where(cold, _polynomial(t, _COLD[0]), _polynomial(t, _WARM[0]))
    beta = np.exp(np.where(cold, _polynomial(t, _COLD[1]), _polynomial(t, _WARM[1])))
    below = np.minimum(share, 1.0)  # at and above boiling both terms vanish
    return np.exp(alpha * (1.0 - below) + beta * (1.0 / below - 1.0))


def dew_point(partial_pressure: Any, pressure: Any) -> Any:
    """Temperature at which air with that partial pressure of water is saturated over liquid [K].

    Newton's method on the logarithm of the pressure; NaN where there is less water than liquid
    at -100 degC gives, the lower end of the saturation equation.
    """
    target = np.log(np.where(partial_pressure > 0.0, partial_pressure, np.nan))
    # Magnus' form starts it within 1 K from -100 to 100 degC; six steps end it at rounding.
    start = target - np.log(611.2)
    found: Any = ZERO_CELSIUS + 243.12 * start / (17.62 - start)
    for _ in range(6):
        found = np.where(found > 150.0, found, 150.0)
        step = 1e-3
        here = np.log(saturation_pressure(found) * enhancement_factor(found, pressure))
        next_ = saturation_pressure(found + step) * enhancement_factor(found + step, pressure)
        found = found - (here - target) * step / (np.log(next_) - here)
    return np.where(found >= 173.15, found, np.nan)


# --- volume ----------------------------------------------------------------------------


def _second_virial(temperature: Any, x: Any) -> tuple[Any, Any]:
    """Second virial coefficient of the mixture [m3/mol] and T^2 times its second derivative.

    Hyland & Wexler 1983: air, water and air with water; cm3/mol, and 1/Pa for water.
    """
    u = 1.0 / temperature
    air = 34.9568 + u * (-6687.72 + u * (-2.10141e6 + u * 9.24746e7))
    air_2 = u * (-2.0 * 6687.72 + u * (-6.0 * 2.10141e6 + u * 12.0 * 9.24746e7))
    cross = 32.366097 + u * (-14113.8 + u * (-1.244535e6 + u * u * -2.348789e9))
    cross_2 = u * (-2.0 * 14113.8 + u * (-6.0 * 1.244535e6 + u * u * -20.0 * 2.348789e9))
    z = 1734.29 * u
    grown = -0.147184e-8 * np.exp(z)
    scale = GAS_CONSTANT * temperature
    water = scale * (0.70e-8 + grown)
    water_2 = scale * grown * z * z  # T (T e^(c/T))'' = (c/T)^2 e^(c/T)
    dry, both, wet = (1.0 - x) ** 2, 2.0 * x * (1.0 - x), x * x
    value = (dry * air + both * cross) * 1e-6 + wet * water
    curvature = (dry * air_2 + both * cross_2) * 1e-6 + wet * water_2
    return value, curvature


def compressibility(temperature: Any, pressure: Any, x: Any) -> Any:
    """Compressibility factor of humid air from the second and third virial coefficients."""
    second, _ = _second_virial(temperature, x)
    u = 1.0 / temperature
    # The third coefficient matters at high pressure only, where the air is nearly dry.
    third = (1.0 - x) ** 3 * (1259.75 + u * (-190905.0 + u * 6.32467e7)) * 1e-12
    q = pressure / (GAS_CONSTANT * temperature)
    return 1.0 + q * (second + q * (third - second * second))


def gas_density(temperature: Any, pressure: Any, x: Any) -> Any:
    """Density of humid air [kg/m3]."""
    molar_mass = (1.0 - x) * DRY_AIR + x * WATER
    q = pressure / (GAS_CONSTANT * temperature)
    return q / compressibility(temperature, pressure, x) * molar_mass


# --- heat capacity -----------------------------------------------------------------------

# Ideal gas: Lemmon et al. 2000 for air (powers of tau = 132.6312 K/T in the Helmholtz energy,
# and Planck-Einstein terms), IAPWS-95 for water (tau = 647.096 K/T).
_AIR_POWERS: Final = (
    (6.057194e-8, -3.0), (-2.10274769e-5, -2.0), (-1.58860716e-4, -1.0), (-1.9536342e-4, 1.5),
)  # fmt: skip
_AIR_VIBRATIONS: Final = ((0.791309509, 25.36365), (0.212236768, 16.90741))
_WATER_VIBRATIONS: Final = (
    (0.012436, 1.28728967), (0.97315, 3.53734222), (1.2795, 7.74073708), (0.96956, 9.24437796),
    (0.24873, 27.5075105),
)  # fmt: skip


def _vibrations(tau: Any, terms: tuple[tuple[float, float], ...]) -> Any:
    total: Any = 0.0
    for weight, theta in terms:
        z = theta * tau
        fall = np.exp(-z)
        total = total + weight * z * z * fall / (1.0 - fall) ** 2
    return total


def gas_heat_capacity(temperature: Any, pressure: Any, x: Any) -> Any:
    """Isobaric heat capacity of humid air by mass, with the second virial's share [J/(kg K)]."""
    tau = 132.6312 / temperature
    air = 3.490888032 + _vibrations(tau, _AIR_VIBRATIONS)
    for weight, power in _AIR_POWERS:
        air = air - weight * power * (power - 1.0) * tau**power
    water = 4.00632 + _vibrations(647.096 / temperature, _WATER_VIBRATIONS)
    _, curvature = _second_virial(temperature, x)
    molar = GAS_CONSTANT * ((1.0 - x) * air + x * water) - pressure * curvature / temperature
    return molar / ((1.0 - x) * DRY_AIR + x * WATER)


# --- transport ---------------------------------------------------------------------------


def _reduced(temperature: Any, pressure: Any) -> tuple[Any, Any]:
    """Lemmon & Jacobsen's tau and delta, with the ideal gas's density in the small terms."""
    return 132.6312 / temperature, pressure / (GAS_CONSTANT * temperature) / 10447.7


def _dilute_air_viscosity(temperature: Any) -> Any:
    """Viscosity of dry air at zero density [uPa s]: Lemmon & Jacobsen 2004."""
    log = np.log(temperature / 103.3)
    omega = np.exp(_polynomial(log, (0.431, -0.4623, 0.08406, 0.005341, -0.00331)))
    return 0.0266958 * np.sqrt(28.9586 * temperature) / (0.360**2 * omega)


def _dry_air_viscosity(temperature: Any, pressure: Any) -> Any:
    """Viscosity of dry air [uPa s], with the two density terms that matter below 1 MPa."""
    tau, delta = _reduced(temperature, pressure)
    density_part = 10.72 * tau**0.2 * delta - 8.876 * tau**0.6 * delta * np.exp(-delta)
    return _dilute_air_viscosity(temperature) + density_part


def _dry_air_conductivity(temperature: Any, pressure: Any) -> Any:
    """Thermal conductivity of dry air [mW/(m K)], with the density terms below 1 MPa."""
    tau, delta = _reduced(temperature, pressure)
    dilute = 1.308 * _dilute_air_viscosity(temperature) + 1.405 * tau**-1.1 - 1.036 * tau**-0.3
    return dilute + 8.743 * tau**0.1 * delta + 14.76 * delta * delta


def _vapour_viscosity(temperature: Any) -> Any:
    """Viscosity of water vapour at zero density [uPa s]: IAPWS R12-08."""
    u = 647.096 / temperature
    below = _polynomial(u, (1.67752, 2.20462, 0.6366564, -0.241605))
    return 100.0 / (np.sqrt(u) * below)


def _vapour_conductivity(temperature: Any) -> Any:
    """Thermal conductivity of water vapour at zero density [mW/(m K)]: IAPWS R15-11."""
    u = 647.096 / temperature
    below = _polynomial(u, (2.443221e-3, 1.323095e-2, 6.770357e-3, -3.454586e-3, 4.096266e-4))
    return 1.0 / (np.sqrt(u) * below)


def _mixed(air: Any, vapour: Any, temperature: Any, pressure: Any, x: Any) -> Any:
    """Wilke's rule with the viscosities of both gases at this temperature.

    The saturated vapour at the total pressure, which one engine takes instead, is much hotter.
    """
    ratio = _dry_air_viscosity(temperature, pressure) / _vapour_viscosity(temperature)
    mass = DRY_AIR / WATER
    air_by_vapour = (1.0 + np.sqrt(ratio) * mass**-0.25) ** 2 / (8.0 * (1.0 + mass)) ** 0.5
    vapour_by_air = (1.0 + np.sqrt(1.0 / ratio) * mass**0.25) ** 2 / (
        8.0 * (1.0 + 1.0 / mass)
    ) ** 0.5
    dry = 1.0 - x
    return dry * air / (dry + x * air_by_vapour) + x * vapour / (x + dry * vapour_by_air)


def gas_viscosity(temperature: Any, pressure: Any, x: Any) -> Any:
    """Dynamic viscosity of humid air [Pa s]."""
    air, vapour = _dry_air_viscosity(temperature, pressure), _vapour_viscosity(temperature)
    return 1e-6 * _mixed(air, vapour, temperature, pressure, x)


def gas_thermal_conductivity(temperature: Any, pressure: Any, x: Any) -> Any:
    """Thermal conductivity of humid air [W/(m K)]."""
    air = _dry_air_conductivity(temperature, pressure)
    return 1e-3 * _mixed(air, _vapour_conductivity(temperature), temperature, pressure, x)


def water_diffusivity(temperature: Any, pressure: Any) -> Any:
    """Diffusivity of water vapour in air [m2/s]: Massman 1998."""
    return 0.2178e-4 * (temperature / ZERO_CELSIUS) ** 1.81 * (ATMOSPHERE / pressure)


# Kim et al. 2005: 67.30 nm in dry air at 296.15 K and 101325 Pa, the value that belongs to
# their slip correction.
_PATH: Final = 67.30e-9
_PATH_TEMPERATURE: Final = 296.15


def gas_mean_free_path(temperature: Any, pressure: Any, x: Any) -> Any:
    """Mean free path [m], from the reference value by kinetic theory: viscosity sqrt(T/M)/p."""
    reference = float(gas_viscosity(_PATH_TEMPERATURE, ATMOSPHERE, 0.0))
    molar_mass = (1.0 - x) * DRY_AIR + x * WATER
    speed = np.sqrt(temperature / _PATH_TEMPERATURE * (DRY_AIR / molar_mass))
    thicker = gas_viscosity(temperature, pressure, x) / reference
    return _PATH * thicker * speed * (ATMOSPHERE / pressure)
