"""Equation of state and viscosity of n-hexadecane, evaluated for `convert_solvents.py`.

CoolProp has no n-hexadecane. Equation of state: Romeo R., doctoral thesis, Politecnico di
Torino, 2018. Viscosity: Meng et al., J. Phys. Chem. Ref. Data 47 (2018) 033102,
doi:10.1063/1.5039595. The coefficients, and printed test values that this file reproduces,
were seen in an open-source program; the papers were not seen.
"""

from __future__ import annotations

import math

from scipy.optimize import brentq

__all__ = ["density", "heat_capacity", "heat_of_vaporisation", "speed_of_sound", "viscosity"]

R = 8.3144621
TC = 722.1
RHO_C = 1.0  # mol/L
M = 226.441  # g/mol
# n, d, t of the polynomial terms
POLYNOMIAL = [
    (0.03965879, 4, 1.0),
    (1.945813, 1, 0.224),
    (-3.738575, 1, 0.91),
    (-0.3428167, 2, 0.95),
    (0.3427022, 3, 0.555),
]
# n, d, t, c of the exponential terms
EXPONENTIAL = [
    (-2.519592, 1, 2.36, 2),
    (-0.8948857, 3, 3.58, 2),
    (0.10760773, 2, 0.5, 1),
    (-1.297826, 2, 1.72, 2),
    (-0.04832312, 7, 1.078, 1),
]
# n, d, t, alpha, beta, gamma, epsilon of the Gaussian terms
GAUSSIAN = [
    (4.245522, 1, 1.14, 0.641, 0.516, 1.335, 0.75),
    (-0.31527585, 1, 2.43, 1.008, 0.669, 1.187, 1.616),
    (-0.7212941, 3, 1.75, 1.026, 0.25, 1.39, 0.47),
    (-0.2680657, 2, 1.1, 1.21, 1.33, 1.23, 1.306),
    (-0.7859567, 2, 1.08, 0.93, 2.1, 0.763, 0.46),
]
# ideal gas: cp/R = 23 + Einstein terms (m, theta)
EINSTEIN = [(18.9, 420.0), (76.2, 1860.0)]


def residual(delta: float, tau: float) -> float:
    """Residual part of the reduced Helmholtz energy."""
    total = sum(n * delta**d * tau**t for n, d, t in POLYNOMIAL)
    total += sum(n * delta**d * tau**t * math.exp(-(delta**c)) for n, d, t, c in EXPONENTIAL)
    total += sum(
        n * delta**d * tau**t * math.exp(-a * (delta - e) ** 2 - b * (tau - g) ** 2)
        for n, d, t, a, b, g, e in GAUSSIAN
    )
    return total


def _slopes(delta: float, tau: float) -> tuple[float, float, float, float]:
    """First and second delta, mixed, second tau derivatives by central differences."""
    h, k = 1e-4 * delta, 1e-4 * tau

    def f(i: int, j: int) -> float:
        return residual(delta + i * h, tau + j * k)

    first = (8.0 * (f(1, 0) - f(-1, 0)) - (f(2, 0) - f(-2, 0))) / (12.0 * h)
    second = (f(1, 0) - 2.0 * f(0, 0) + f(-1, 0)) / h**2
    mixed = (f(1, 1) - f(1, -1) - f(-1, 1) + f(-1, -1)) / (4.0 * h * k)
    in_tau = (f(0, 1) - 2.0 * f(0, 0) + f(0, -1)) / k**2
    return first, second, mixed, in_tau


def _molar_density(T: float, pressure: float = 101325.0) -> float:
    """mol/L of the liquid; the bracket keeps to the liquid root."""
    guess = 3.4168 - 0.00312 * (T - 293.15)

    def excess(rho: float) -> float:
        delta = rho / RHO_C
        return 1000.0 * rho * R * T * (1.0 + delta * _slopes(delta, TC / T)[0]) - pressure

    return float(brentq(excess, 0.97 * guess, 1.04 * guess, xtol=1e-10))


def density(T: float) -> float:
    """kg/m3 at 101325 Pa."""
    return _molar_density(T) * M


def _caloric(T: float) -> tuple[float, float, float]:
    """cv/R, the mixed term, and the isothermal compression term."""
    delta, tau = _molar_density(T) / RHO_C, TC / T
    first, second, mixed, in_tau = _slopes(delta, tau)
    einstein = sum(
        m * (u / T) ** 2 * math.exp(u / T) / (math.exp(u / T) - 1.0) ** 2 for m, u in EINSTEIN
    )
    cv = 22.0 + einstein - tau**2 * in_tau
    return (
        cv,
        1.0 + delta * first - delta * tau * mixed,
        1.0 + 2.0 * delta * first + delta**2 * second,
    )


def heat_capacity(T: float) -> float:
    """J/(kg K) at 101325 Pa."""
    cv, mixed, compression = _caloric(T)
    return 1000.0 * R / M * (cv + mixed**2 / compression)


def heat_of_vaporisation(T: float) -> float:
    """J/kg, the vapour taken as ideal gas (its pressure is below 2 kPa up to 423 K)."""
    delta, tau = _molar_density(T, 100.0) / RHO_C, TC / T
    k = 1e-4 * tau
    slope = (residual(delta, tau + k) - residual(delta, tau - k)) / (2.0 * k)
    return -1000.0 * R * T / M * (tau * slope + delta * _slopes(delta, tau)[0])


def speed_of_sound(T: float) -> float:
    """m/s at 101325 Pa."""
    cv, mixed, compression = _caloric(T)
    return math.sqrt(1000.0 * R * T / M * (compression + mixed**2 / cv))


def viscosity(T: float) -> float:
    """Pa s at 101325 Pa."""
    rho, tau = _molar_density(T), TC / T
    dilute = 0.32137 * math.sqrt(T) / math.exp(-0.6131 + 414.4 / T - 39759.0 / T**2)
    initial = (7.4345 - 739.4 / T - 2255587.0 / T**2) * rho
    terms = [
        (0.000692129, 9 + 2 / 3, -0.5),
        (0.00645721, 9 + 2 / 3, 0.8),
        (-0.000305913, 11 + 2 / 3, -0.5),
        (1.26656e-12, 24 + 2 / 3, 5.0),
        (21.851, 1.6 + 2 / 3, -0.5),
        (-30.2533, 0.6 + 2 / 3, -1.5),
        (21.0853, 2 / 3, -0.5),
    ]
    return 1e-6 * (dilute + initial + sum(n * rho**d * tau**t for n, d, t in terms))
