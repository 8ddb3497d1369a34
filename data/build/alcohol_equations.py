"""Equations of state and reference correlations of alcohols and polyols, with their coefficients.

`evaluate_alcohols.py` writes their values, and the source of each, to `data/published`.
"""

from __future__ import annotations

from collections.abc import Callable, Sequence
from typing import TypeAlias

import numpy as np
from scipy.optimize import newton

R = 8.314462618  # J/(mol K)
# Columns of coefficients, one per symbol of the term.
Terms: TypeAlias = "Sequence[Sequence[float]]"


class Helmholtz:
    """A multiparameter equation of state: residual terms, critical point, ideal heat capacity.

    Terms are n d^d t^t exp(-g d^c - e(d-eps)^2 - b(t-gam)^2), and the association form
    exp(-e(d-eps)^2 + 1/(b(t-gam)^2 + B)).
    """

    def __init__(
        self,
        M: float,
        Tc: float,
        rhoc: float,
        cp0: Callable[[float], float],
        plain: Terms,
        powers: Terms,
        bells: Terms,
        links: Terms = (),
        gas: float = R,
    ) -> None:
        self.M, self.Tc, self.rhoc, self.cp0, self.gas = M, Tc, rhoc, cp0, gas
        self.plain, self.powers, self.bells, self.links = plain, powers, bells, links

    def alpha(self, d: complex, t: complex) -> complex:
        total = sum(n * d**i * t**j for n, i, j in zip(*self.plain, strict=True))
        total += sum(
            n * d**i * t**j * np.exp(-(d**c)) for n, i, j, c in zip(*self.powers, strict=True)
        )
        total += sum(
            n * d**i * t**j * np.exp(-a * (d - e) ** 2 - b * (t - g) ** 2)
            for n, i, j, a, b, g, e in zip(*self.bells, strict=True)
        )
        if self.links:
            total += sum(
                n * d**i * t**j * np.exp(-a * (d - e) ** 2 + 1 / (b * (t - g) ** 2 + B))
                for n, i, j, a, b, g, e, B in zip(*self.links, strict=True)
            )
        return complex(total)

    def derivatives(self, T: float, rho: float) -> tuple[float, float, float, float]:
        """d a_d, d2 a_dd, d t a_dt, t2 a_tt."""
        d, t, h, s = rho / self.rhoc, self.Tc / T, 1e-30, 1e-5

        def by_d(d: float, t: float) -> float:
            return self.alpha(d + 1j * h, t).imag / h

        def by_t(d: float, t: float) -> float:
            return self.alpha(d, t + 1j * h).imag / h

        a_d = by_d(d, t)
        a_dd = (by_d(d * (1 + s), t) - by_d(d * (1 - s), t)) / (2 * d * s)
        a_dt = (by_d(d, t * (1 + s)) - by_d(d, t * (1 - s))) / (2 * t * s)
        a_tt = (by_t(d, t * (1 + s)) - by_t(d, t * (1 - s))) / (2 * t * s)
        return d * a_d, d * d * a_dd, d * t * a_dt, t * t * a_tt

    def pressure(self, T: float, rho: float) -> float:
        d, t, h = rho / self.rhoc, self.Tc / T, 1e-30
        return rho / self.M * self.gas * T * (1 + d * self.alpha(d + 1j * h, t).imag / h)

    def density(self, T: float, p: float, start: float) -> float:
        """The liquid's density, by secants from a start value close to it."""
        return float(newton(lambda rho: self.pressure(T, rho) - p, start, x1=start * 1.001))

    def heat_capacity(self, T: float, rho: float) -> float:
        a, aa, at, tt = self.derivatives(T, rho)
        cv = self.cp0(T) - 1 - tt
        return float((cv + (1 + a - at) ** 2 / (1 + 2 * a + aa)) * self.gas / self.M)

    def speed(self, T: float, rho: float) -> float:
        a, aa, at, tt = self.derivatives(T, rho)
        cv = self.cp0(T) - 1 - tt
        square = self.gas * T / self.M * (1 + 2 * a + aa + (1 + a - at) ** 2 / cv)
        return float(np.sqrt(square))


def einstein(T: float, theta: float) -> float:
    u = theta / T
    return float(u * u * np.exp(u) / np.expm1(u) ** 2)


GLYCOL = Helmholtz(
    0.06206784, 719.0, 364.9588992, lambda T: 4 + 20.86 * einstein(T, 1260.0),
    ([0.019393376, 1.2215576, 1.2751617, -3.6681302, -1.4660821, 0.24628603, -0.063217756],
     [5, 1, 1, 1, 2, 3, 4], [1.0, 0.1, 1.27, 1.244, 1.1, 0.32, 1.0]),
    ([1.4131488, 3.5245547, -2.2658015, 0.94972119, -0.13037392, 0.19881857, -0.022141839],
     [2, 3, 3, 4, 5, 6, 7], [0.89, 1.2, 1.34, 1.3, 1.49, 1.23, 0.18], [1] * 7),
    ([1.1273408, -0.12188623, -0.79487875, -0.024231918, -0.00574040155, 0.0083087704,
      -0.041852456], [1, 1, 2, 3, 4, 5, 3], [1.1, 0.75, 0.79, 0.77, 0.6, 1.0, 1.0],
     [0.9, 1.35, 0.8, 1.9, 2.0, 1.3, 20.0], [0.91, 1.25, 0.97, 0.5, 1.0, 0.42, 1000.0],
     [1.17, 1.49, 1.3, 1.5, 1.2, 1.2, 1.07], [1.37, 0.4, 1.0, 2.45, 1.9, 2.0, 0.9]),
    gas=8.3144598,
)  # fmt: skip
PROPANOL = Helmholtz(
    0.06009502, 536.85, 270.90835016,
    lambda T: 4.8 + 5.8589 * einstein(T, 583) + 15.295 * einstein(T, 1851)
    + 6.7218 * einstein(T, 4963),
    ([0.8501919587338e-2, 0.1769572654173e1, -0.2601616361951e1, -0.8069586507251,
      0.2699091898091, -0.1517099751574], [4, 1, 1, 2, 3, 2],
     [1, 0.383486245565, 1.00673506221, 1.000655973878, 0.737864791347, 0.75644462067]),
    ([-0.136826694139, 0.8186955171291, -0.1203832429174, -0.4787596045266, -0.8352292782826,
      -0.1183324061791e-1, 0.1434056590817, -0.1207771529821e1, 0.1691887723885e-1],
     [3, 2, 3, 1, 1, 1, 2, 2, 2],
     [1.467225414428, 2.436829620603, 0.473745795953, 0.465572868745, 1.890981559655,
      12.649968615492, 1.264813959298, 4.289888248699, 4.52793432034],
     [2, 2, 1, 1, 2, 3, 1, 2, 3]),
    ([0.10839278117, 0.1146462676421e1, -0.1450150007612, 0.6173688940994, -0.2525141509726,
      0.2968112512824e-1, -0.9084481771871e1, -0.1141221110371e1], [1, 1, 3, 1, 2, 2, 1, 1],
     [14.73606008844, 0.559526227486, 1.617872490534, 2.115863103468, 2.011307384187,
      4.628909223213, 2.469668299598, 17.167683459526],
     [1499.87889513, 0.05730523, 0.0609921, 0.42166279, 0.33164463, 0.25315696, 0.97960817,
      228.01781612],
     [20.2675115, 0.6422969, 0.5898219, 0.1843193, 0.2186612, 3.2564005, 5.0181177, 20.0187472],
     [1.841707031, 1.061285623, 0.596951091, 0.833305507, 1.503334094, 0.565023908, 1.214102874,
      1.809889063],
     [0.015068023, 2.018661345, -0.589364213, 1.9423568, 1.085816589, 1.510740203, -0.122527829,
      0.135063877]),
    ([-0.5110634296449e-1, -0.1938787172895e-2, -0.1865834030357e-1, 0.1194615747104e-2],
     [1, 1, 1, 1], [0.606487738911, 2.538481255171, 1.636947334141, 3.175214539812],
     [0.72884509, 1.09047435, 0.20356499, 0.76583431],
     [2.4878069, 0.0890810, 0.0697761, 0.0583633],
     [1.127828698, 1.135904338, 1.688273219, 1.116235043],
     [0.474063025, -0.67936823, -0.206270268, -0.454639836],
     [0.553635447, 0.11706642, 0.305768855, 0.105098566]),
    gas=8.3144598,
)  # fmt: skip

_VIRIAL = [-19.572881, 219.73999, -1015.3226, 2471.0125, -3375.1717, 2491.6597, -787.26086,
           14.085455, -0.34664158]  # fmt: skip
_VIRIAL_T = [0, -0.25, -0.5, -0.75, -1, -1.25, -1.5, -2.5, -5.5]


def initial_density(
    T: float, rho: float, M: float, sigma: float, ek: float, dilute: float
) -> float:
    """Rainwater-Friend term of the viscosity, in the unit of `dilute`."""
    reduced = T / ek
    second = sum(b * reduced**t for b, t in zip(_VIRIAL, _VIRIAL_T, strict=True))
    return float(dilute * second * 6.02214076e23 * (sigma * 1e-9) ** 3 * rho / M)


def glycol_viscosity(T: float, rho: float) -> float:
    Tr, rr = T / 719.0, rho / 364.9588992
    dilute = 0.414421 + 16.9125 * Tr + 4.88979 * Tr**2 - 2.46114 * Tr**3
    rest = rr ** (2 / 3) * Tr**0.5 * np.exp(
        2.5357387 + 1.8519087 * rr + 0.069643296 * rr / Tr**2
        + 1.9804739e-3 * rr**4 / Tr**3 - 1.5781297 * Tr - 0.18187941 * rr**2
    )  # fmt: skip
    first = initial_density(T, rho, 0.06206784, 0.4482, 570.9, dilute)
    return float(1e-6 * (dilute + first + rest))


def propylene_glycol_viscosity(T: float, rho: float) -> float:
    Tr, rr = T / 674.0, rho / 339.3811132
    c = (1.15331, 10.6228, 13.1421, -9.37974, 2.08103)
    dilute = sum(k * Tr**i for i, k in enumerate(c))
    rest = rr ** (2 / 3) * Tr**0.5 * np.exp(
        6.17070938 + 3.15366627 * rr - 0.68768625 * rr**2 / Tr
        + 0.0879750441 * rr**3 / Tr**2 - 10.2553117 * Tr + 4.36659437 * Tr**2
    )  # fmt: skip
    first = initial_density(T, rho, 0.07609442, 0.4915, 535.2, dilute)
    return float(1e-6 * (dilute + first + rest))


def glycol_conductivity(T: float, rho: float) -> float:
    """Without the critical enhancement, which is below 0.5 % here."""
    Tr, rr = T / 719.0, rho / 364.9588992
    c = (-0.59047, -29.94381, 212.14796, -142.01157, 32.40568)
    dilute = 1e-3 * sum(k * Tr**i for i, k in enumerate(c))
    n = [-7.569160e-2, 1.013690e-1, 5.117180e-1, -4.43549e-1, -5.127560e-1, 4.196610e-1,
         1.858730e-1, -1.358010e-1, -2.240910e-2, 1.467970e-2]  # fmt: skip
    return float(dilute + sum((n[2 * i] + n[2 * i + 1] * Tr) * rr ** (i + 1) for i in range(5)))
