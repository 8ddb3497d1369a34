"""Equations of two handbooks (Perry, VDI Heat Atlas), and what all such files share.

Coefficients are digit for digit those that were seen. An evaluation is no measurement: it
stands for its handbook, once, however many temperatures it is evaluated at.
"""

from __future__ import annotations

import math
from collections.abc import Callable, Iterable
from dataclasses import dataclass

__all__ = [
    "CHEMICALS",
    "EVALUATED",
    "MOLAR_MASS",
    "Equations",
    "R",
    "grid",
    "perry",
    "rows",
    "vdi",
    "wagner",
]

R = 8.31446261815324
CHEMICALS = (
    "# seen: coefficients read from the data files that ship with the open-source library "
    "chemicals 1.5.2; handbook itself not seen"
)
EVALUATED = "# note: rows marked equation are evaluations of the printed equation, made here"
# kg/mol, from the identifier table of chemicals 1.5.2 (PubChem)
MOLAR_MASS = {
    "acetone": 0.05807914, "2-butanone": 0.07210572, "ethyl_acetate": 0.08810512,
    "toluene": 0.09213842, "n-heptane": 0.10020194, "n-dodecane": 0.17033484,
    "n-hexadecane": 0.22644116, "dimethyl_sulfoxide": 0.07813344,
}  # fmt: skip


@dataclass(frozen=True)
class Equations:
    """Comment lines and rows (liquid, property, T, value) of one source."""

    head: list[str]
    rows: list[list[str]]


def grid(low: float, high: float, step: float = 20.0) -> list[float]:
    """Temperatures from 253.15 K on, inside a range, never above 433.15 K."""
    inside = [253.15 + step * i for i in range(19)]
    return [T for T in inside if max(low, 253.0) <= T <= min(high, 433.2)]


def rows(
    liquid: str, prop: str, f: Callable[[float], float], temperatures: Iterable[float]
) -> list[list[str]]:
    return [[liquid, prop, f"{T:.2f}", f"{f(T):.5g}"] for T in temperatures]


# --- Perry's Chemical Engineers' Handbook, 8th ed. -----------------------------------------
# Table 2-8, ln p = C1 + C2/T + C3 ln T + C4 T^C5, Pa; range K
PERRY_P = {
    "acetone": (69.006, -5599.6, -7.0985, 6.2237e-06, 2, 178.45, 508.2),
    "2-butanone": (72.698, -6143.6, -7.5779, 5.6476e-06, 2, 186.48, 535.5),
    "toluene": (76.945, -6729.8, -8.179, 5.3017e-06, 2, 178.18, 591.75),
    "ethyl_acetate": (66.824, -6227.6, -6.41, 1.7914e-17, 6, 189.6, 523.3),
    "n-heptane": (87.829, -6996.4, -9.8802, 7.2099e-06, 2, 182.57, 540.2),
    "n-dodecane": (137.47, -11976, -16.698, 8.0906e-06, 2, 263.57, 658.0),
    "n-hexadecane": (156.06, -15015, -18.941, 6.8172e-06, 2, 291.31, 723.0),
    "dimethyl_sulfoxide": (56.273, -7620.6, -4.6279, 4.3819e-07, 2, 291.67, 729.0),
}
# Table 2-150, C1 (1 - Tr)^C2, J/mol; Tc, lowest T
PERRY_H = {
    "acetone": (42150, 0.3397, 508.2, 178.45),
    "2-butanone": (46220, 0.355, 535.5, 186.48),
    "toluene": (49507, 0.37742, 591.75, 178.18),
    "ethyl_acetate": (49330, 0.3847, 523.3, 189.6),
    "n-heptane": (50014, 0.38795, 540.2, 182.57),
    "n-dodecane": (77337, 0.40681, 658.0, 263.57),
    "n-hexadecane": (101560, 0.45726, 723.0, 291.31),
    "dimethyl_sulfoxide": (66290, 0.4084, 729.0, 291.67),
}
# Table 2-153, C1 + C2 T + C3 T^2 + C4 T^3, J/(kmol K); range K
PERRY_C = {
    "acetone": (135600, -177, 0.2837, 0.000689, 178.45, 329.44),
    "2-butanone": (132300, 200.87, -0.9597, 0.0019533, 186.48, 373.15),
    "toluene": (140140, -152.3, 0.695, 0, 178.18, 500.0),
    "ethyl_acetate": (226230, -624.8, 1.472, 0, 189.6, 350.21),
    "n-dodecane": (508210, -1368.7, 3.1015, 0, 263.57, 330.0),
    "n-hexadecane": (370350, 231.47, 0.68632, 0, 291.31, 560.01),
    "dimethyl_sulfoxide": (240300, -595, 1.013, 0, 291.67, 422.15),
}
# Table 2-315, C1 + C2 T, W/(m K); range K
PERRY_K = {
    "acetone": (0.2878, -0.000427, 178.45, 343.15),
    "2-butanone": (0.2197, -0.0002505, 186.48, 352.79),
    "toluene": (0.20463, -0.00024252, 178.18, 474.85),
    "ethyl_acetate": (0.2501, -0.0003563, 189.6, 350.21),
    "n-heptane": (0.215, -0.000303, 182.57, 371.58),
    "n-dodecane": (0.2047, -0.0002326, 263.57, 489.47),
    "n-hexadecane": (0.20749, -0.00021917, 291.31, 560.01),
    "dimethyl_sulfoxide": (0.3142, -0.00030809, 291.67, 464.0),
}


def perry() -> Equations:
    found: list[list[str]] = []
    for liquid, (a, b, c, d, e, low, high) in PERRY_P.items():
        found += rows(
            liquid,
            "vapour_pressure",
            lambda T, a=a, b=b, c=c, d=d, e=e: math.exp(a + b / T + c * math.log(T) + d * T**e),
            grid(low, high),
        )
    for liquid, (a, b, Tc, low) in PERRY_H.items():
        m = MOLAR_MASS[liquid]
        found += rows(
            liquid,
            "heat_of_vaporisation",
            lambda T, a=a, b=b, Tc=Tc, m=m: a / m * (1.0 - T / Tc) ** b,
            grid(low, Tc),
        )
    for liquid, (a, b, c, d, low, high) in PERRY_C.items():
        m = 1000.0 * MOLAR_MASS[liquid]
        found += rows(
            liquid,
            "heat_capacity",
            lambda T, a=a, b=b, c=c, d=d, m=m: (a + b * T + c * T * T + d * T**3) / m,
            grid(low, high, 10.0),
        )
    for liquid, (a, b, low, high) in PERRY_K.items():
        found += rows(
            liquid, "thermal_conductivity", lambda T, a=a, b=b: a + b * T, grid(low, high)
        )
    # Table 2-32, C1/C2^(1 + (1 - T/C3)^C4), kmol/m3: only where papers do not reach
    molar = MOLAR_MASS["dimethyl_sulfoxide"] * 1000.0
    found += rows(
        "dimethyl_sulfoxide",
        "density",
        lambda T: molar * 1.1096 / 0.25189 ** (1.0 + (1.0 - T / 729.0) ** 0.3311),
        grid(325.0, 400.0),
    )
    # Table 2-313, ln eta = C1 + C2/T + C3 ln T: likewise
    found += rows(
        "dimethyl_sulfoxide",
        "viscosity",
        lambda T: math.exp(-37.347 + 2835.0 / T + 3.7937 * math.log(T)),
        grid(292.0, 400.0),
    )
    found += rows(
        "acetone",
        "viscosity",
        lambda T: math.exp(-14.918 + 1023.4 / T + 0.5961 * math.log(T)),
        grid(250.0, 329.5, 10.0),
    )
    head = [
        "# source: Perry's Chemical Engineers' Handbook, 8th ed. (2008), tables 2-8, 2-32, 2-150, "
        "2-153, 2-313, 2-315",
        CHEMICALS,
        "# uncertainty: not stated in the copy",
        EVALUATED,
        "# note: density and viscosity only where no measured values were seen that far",
    ]
    return Equations(head, found)


# --- VDI Heat Atlas, 2nd ed., PPDS equations ------------------------------------------------
# Tc, rho_c, A..D: rho = rho_c + A t^0.35 + B t^(2/3) + C t + D t^(4/3), t = 1 - T/Tc
VDI_RHO = {
    "2-butanone": (535.55, 270, 560.7857, -90.7312, 454.3929, -120.5211),
    "ethyl_acetate": (523.2, 308, 660.3752, 8.8513, 207.168, 1.5101),
}
# E exp(A r^(1/3) + B r^(4/3)), r = (C - T)/(T - D)
VDI_ETA = {
    "acetone": (1.65496, 0.5733, 610.687, 11.477, 0.00002915),
    "2-butanone": (3.36887, 0.15106, 994.604, 10.71, 0.00000262),
    "ethyl_acetate": (2.87505, 3.82999, 701.624, -475.816, 0.00000853),
}
# A (1 - Tr)^B
VDI_SIGMA = {
    "acetone": (508.1, 0.06223, 1.12463),
    "2-butanone": (535.55, 0.05945, 1.11696),
    "toluene": (591.75, 0.06676, 1.24386),
    "n-dodecane": (658.1, 0.05549, 1.32644),
    "ethyl_acetate": (523.2, 0.05977, 1.11993),
    "n-heptane": (541.23, 0.05422, 1.25287),
    "n-hexadecane": (723.05, 0.05742, 1.40834),
}
# R Tc (A t^(1/3) + B t^(2/3) + C t + D t^2 + E t^6), J/mol
VDI_H = {
    "acetone": (508.1, 5.74063, 9.13074, -4.880084, 0.019915, 3.765513),
    "2-butanone": (535.55, 7.14228, 6.74892, -2.395885, -2.807929, 1.610334),
    "toluene": (591.75, 4.60584, 13.97224, -10.592315, 2.120205, 4.277128),
    "n-dodecane": (658.1, 7.96676, 8.96561, -2.426306, -1.278554, 16.571637),
    "ethyl_acetate": (523.2, 8.65545, 3.3011, -0.160488, -0.850538, 1.010147),
    "n-heptane": (541.23, 3.33801, 21.88936, -18.680507, 5.467222, 2.994395),
    "n-hexadecane": (723.05, 11.99309, 8.12193, -8.228896, 5.197405, 26.068465),
}
# ln(p/pc) = (A t + B t^1.5 + C t^2.5 + D t^5)/Tr
VDI_P = {
    "acetone": (508.1, 4692000, -7.67033, 1.96469, -2.4438, -2.90162),
    "2-butanone": (535.55, 4150000, -7.89149, 2.46953, -3.5251, -0.92713),
    "toluene": (591.75, 4126000, -7.50051, 2.08939, -2.56368, -2.85042),
    "n-dodecane": (658.1, 1818000, -8.97902, 2.4053, -4.55315, -5.99492),
    "ethyl_acetate": (523.2, 3830000, -7.89734, 2.16798, -3.5239, -3.10641),
    "n-heptane": (541.23, 2774000, -7.75469, 1.84795, -2.80333, -3.62418),
    "n-hexadecane": (723.05, 1400000, -8.96067, 0.85195, -4.0408, -8.42218),
}
MELTING = {"n-dodecane": 263.65, "n-hexadecane": 291.45}


def wagner(T: float, Tc: float, pc: float, c: tuple[float, ...], n: tuple[float, ...]) -> float:
    t = 1.0 - T / Tc
    return pc * math.exp(Tc / T * sum(a * t**e for a, e in zip(c, n, strict=True)))


def vdi() -> Equations:
    found: list[list[str]] = []
    for liquid, (Tc, rho_c, *c) in VDI_RHO.items():
        found += rows(
            liquid,
            "density",
            lambda T, Tc=Tc, r=rho_c, c=c: (
                r
                + sum(
                    a * (1.0 - T / Tc) ** n
                    for a, n in zip(c, (0.35, 2 / 3, 1.0, 4 / 3), strict=True)
                )
            ),
            grid(253.0, 373.2, 10.0),
        )
    for liquid, (a, b, c_, d, e) in VDI_ETA.items():

        def eta(T: float, a: float = a, b: float = b, c: float = c_, d: float = d, e: float = e
                ) -> float:  # fmt: skip
            r = (c - T) / (T - d)
            return e * math.exp(a * r ** (1 / 3) + b * r ** (4 / 3))

        found += rows(liquid, "viscosity", eta, grid(253.0, 373.2, 10.0))
    for liquid, (Tc, a, b) in VDI_SIGMA.items():
        found += rows(
            liquid,
            "surface_tension",
            lambda T, Tc=Tc, a=a, b=b: a * (1.0 - T / Tc) ** b,
            grid(MELTING.get(liquid, 253.0), 423.2),
        )
    for liquid, (Tc, *c) in VDI_H.items():
        found += rows(
            liquid,
            "heat_of_vaporisation",
            lambda T, Tc=Tc, c=c, m=MOLAR_MASS[liquid]: (
                R
                * Tc
                / m
                * sum(
                    a * (1.0 - T / Tc) ** n
                    for a, n in zip(c, (1 / 3, 2 / 3, 1.0, 2.0, 6.0), strict=True)
                )
            ),
            grid(MELTING.get(liquid, 253.0), 433.2),
        )
    for liquid, (Tc, pc, *p) in VDI_P.items():
        found += rows(
            liquid,
            "vapour_pressure",
            lambda T, Tc=Tc, pc=pc, p=p: wagner(T, Tc, pc, tuple(p), (1.0, 1.5, 2.5, 5.0)),
            grid(MELTING.get(liquid, 253.0), 433.2),
        )
    head = [
        "# source: VDI Heat Atlas, 2nd ed. (2010), PPDS equations (section D3)",
        CHEMICALS,
        EVALUATED,
        "# note: density and viscosity equations only where measured values were few",
    ]
    return Equations(head, found)
