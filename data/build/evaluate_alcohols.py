"""Values of published equations for alcohols and polyols, written to `data/published`.

    python data/build/evaluate_alcohols.py

Handbook coefficients are read from the data files of the open-source library chemicals (they
came from the handbooks named there); equations of state and reference correlations carry their
coefficients below, each with its source. What comes out is a formula's value at round
temperatures, not a measurement, and every file says so.
"""

from __future__ import annotations

import csv
from collections.abc import Callable, Iterable
from pathlib import Path

import chemicals
import numpy as np
from convert_alcohols import mixture, pure
from scipy.optimize import newton

DATA = Path(chemicals.__file__).parent
SEEN = "# seen: coefficients read in the data files of the open-source library chemicals 1.5.2"
NOTE = "# note: values of the published formula at round temperatures, not measurements"
R = 8.314462618
CAS = {
    "56-81-5": ("glycerol", 0.09209382),
    "107-21-1": ("ethylene_glycol", 0.06206784),
    "57-55-6": ("propylene_glycol", 0.07609442),
    "67-56-1": ("methanol", 0.03204186),
    "64-17-5": ("ethanol", 0.04606844),
    "71-23-8": ("1-propanol", 0.06009502),
    "67-63-0": ("2-propanol", 0.06009502),
}
GRID = np.arange(243.15, 423.2, 10.0)
Rows = list[list[str]]


def table(path: str) -> list[dict[str, str]]:
    """Rows of one data file of chemicals, for the liquids here."""
    with (DATA / path).open(encoding="utf-8") as handle:
        rows = list(csv.DictReader(handle, delimiter="\t"))
    name = next(iter(rows[0]))
    return [{**row, "CAS": row[name].strip()} for row in rows if row[name].strip() in CAS]


def numbers(row: dict[str, str], names: Iterable[str]) -> list[float]:
    return [float(row[name] or 0.0) for name in names]


def values(
    liquid: str,
    prop: str,
    low: float,
    high: float,
    function: Callable[[float], float],
    grid: np.ndarray = GRID,
) -> Rows:
    """Rows of a formula on the grid inside its range."""
    return [
        [liquid, prop, f"{T:.2f}", f"{function(float(T)):.6g}", ""]
        for T in grid
        if low <= T <= high
    ]


def perry() -> None:
    rows: Rows = []
    for row in table("Density/Perry Parameters 105.tsv"):
        liquid, M = CAS[row["CAS"]]
        a, b, c, d, lo, hi = numbers(row, ["C1", "C2", "C3", "C4", "Tmin", "Tmax"])
        rows += values(
            liquid, "density", lo, hi,
            lambda T, a=a, b=b, c=c, d=d, M=M: 1e3 * M * _perry_molar(a, b, c, d, T),
        )  # fmt: skip
    for row in table("Viscosity/Table 2-313 Viscosity of Inorganic and Organic Liquids.tsv"):
        liquid, _ = CAS[row["CAS"]]
        *c, lo, hi = numbers(row, ["C1", "C2", "C3", "C4", "C5", "Tmin", "Tmax"])
        rows += values(liquid, "viscosity", lo, hi, lambda T, c=c: _dippr101(c, T))
    for row in table(
        "Vapor Pressure/Table 2-8 Vapor Pressure of Inorganic and Organic Liquids.tsv"
    ):
        liquid, _ = CAS[row["CAS"]]
        *c, lo, hi = numbers(row, ["C1", "C2", "C3", "C4", "C5", "Tmin", "Tmax"])
        rows += values(liquid, "vapour_pressure", lo, hi, lambda T, c=c: _dippr101(c, T))
    name = "Phase Change/Table 2-150 Heats of Vaporization of Inorganic and Organic Liquids.tsv"
    for row in table(name):
        liquid, M = CAS[row["CAS"]]
        Tc, *c, lo, hi = numbers(row, ["Tc", "C1", "C2", "C3", "C4", "Tmin", "Tmax"])
        rows += values(
            liquid, "heat_of_vaporisation", lo, hi,
            lambda T, Tc=Tc, c=c, M=M: c[0] / M
            * (1 - T / Tc) ** (c[1] + c[2] * T / Tc + c[3] * (T / Tc) ** 2),
        )  # fmt: skip
    for row in table("Heat Capacity/Perry_Table_2-153_DIPPR_100.tsv"):
        liquid, M = CAS[row["CAS"]]
        *c, lo, hi = numbers(row, ["A", "B", "C", "D", "E", "Tmin", "Tmax"])
        rows += values(
            liquid, "heat_capacity", lo, hi,
            lambda T, c=c, M=M: sum(k * T**i for i, k in enumerate(c)) / (1e3 * M),
        )  # fmt: skip
    name = (
        "Thermal Conductivity/Table 2-315 Thermal Conductivity of Inorganic and Organic Liquids.tsv"
    )
    for row in table(name):
        liquid, _ = CAS[row["CAS"]]
        *c, lo, hi = numbers(row, ["C1", "C2", "C3", "C4", "C5", "Tmin", "Tmax"])
        rows += values(
            liquid, "thermal_conductivity", lo, hi,
            lambda T, c=c: sum(k * T**i for i, k in enumerate(c)),
        )  # fmt: skip
    head = [
        "# source: Perry's Chemical Engineers' Handbook, 8th ed., McGraw-Hill 2008, tables 2-8,"
        " 2-32 (equation 105), 2-150, 2-153, 2-313, 2-315",
        SEEN,
        "# uncertainty: not stated in the copy",
        NOTE,
    ]
    pure("PerryGreen2008_alcohols", head, rows)


def _perry_molar(a: float, b: float, c: float, d: float, T: float) -> float:
    """kmol/m3 as printed; some rows of the copy carry mol/m3."""
    value = a / b ** (1 + (1 - T / c) ** d)
    return value / 1e3 if value > 100 else value


def _dippr101(c: list[float], T: float) -> float:
    return float(np.exp(c[0] + c[1] / T + c[2] * np.log(T) + c[3] * T ** c[4]))


def vdi() -> None:
    """VDI Heat Atlas equations, as the library documents them."""
    from chemicals.dippr import EQ106
    from chemicals.viscosity import PPDS9

    rows: Rows = []
    for row in table("Density/VDI PPDS Density of Saturated Liquids.tsv"):
        liquid, _ = CAS[row["CAS"]]
        Tc, rc, *c = numbers(row, ["Tc", "rhoc", "A", "B", "C", "D"])
        rows += values(
            liquid, "density", 243.0, Tc,
            lambda T, Tc=Tc, rc=rc, c=c: rc + sum(
                k * (1 - T / Tc) ** n for k, n in zip(c, (0.35, 2 / 3, 1, 4 / 3), strict=True)),
        )  # fmt: skip
    for row in table("Viscosity/VDI PPDS Dynamic viscosity of saturated liquids polynomials.tsv"):
        liquid, _ = CAS[row["CAS"]]
        c = numbers(row, ["A", "B", "C", "D", "E"])
        rows += values(liquid, "viscosity", 263.0, 423.2, lambda T, c=c: PPDS9(T, *c))
    for row in table("Interface/VDI PPDS surface tensions.tsv"):
        liquid, _ = CAS[row["CAS"]]
        Tm, Tc, *c = numbers(row, ["Tm", "Tc", "A", "B", "C", "D", "E"])
        rows += values(liquid, "surface_tension", max(Tm, 273.0), Tc,
                       lambda T, Tc=Tc, c=c: EQ106(T, Tc, *c))  # fmt: skip
    for row in table("Vapor Pressure/VDI PPDS Boiling temperatures at different pressures.tsv"):
        liquid, _ = CAS[row["CAS"]]
        Tm, Tc, Pc, *c = numbers(row, ["Tm", "Tc", "Pc", "A", "B", "C", "D"])
        rows += values(
            liquid, "vapour_pressure", Tm, Tc,
            lambda T, Tc=Tc, Pc=Pc, c=c: Pc * float(np.exp(Tc / T * sum(
                k * (1 - T / Tc) ** n for k, n in zip(c, (1, 1.5, 2.5, 5), strict=True)))),
        )  # fmt: skip
    for row in table("Phase Change/VDI PPDS Enthalpies of vaporization.tsv"):
        liquid, M = CAS[row["CAS"]]
        Tc, *c = numbers(row, ["Tc", "A", "B", "C", "D", "E"])
        rows += values(
            liquid, "heat_of_vaporisation", 243.0, Tc,
            lambda T, Tc=Tc, c=c, M=M: R / M * Tc * sum(
                k * (1 - T / Tc) ** n
                for k, n in zip(c, (1 / 3, 2 / 3, 1, 2, 6), strict=True)),
        )  # fmt: skip
    name = "Thermal Conductivity/VDI PPDS Thermal conductivity of saturated liquids.tsv"
    for row in table(name):
        liquid, _ = CAS[row["CAS"]]
        c = numbers(row, ["A", "B", "C", "D", "E"])
        rows += values(
            liquid, "thermal_conductivity", 263.0, 423.2,
            lambda T, c=c: sum(k * T**i for i, k in enumerate(c)),
        )  # fmt: skip
    head = [
        "# source: VDI Heat Atlas, 2nd ed., Springer 2010, section D3.1, equations (PPDS forms)",
        SEEN,
        "# uncertainty: not stated in the copy",
        NOTE,
    ]
    pure("VDIHeatAtlas2010_equations_alcohols", head, rows)


def zabransky() -> None:
    """Heat capacity splines; every block inside its own range, constant-pressure rows."""
    rows: Rows = []
    for row in table("Heat Capacity/Zabransky.tsv"):
        liquid, M = CAS[row["CAS"]]
        if row["Data Type"] != "p":
            continue
        spline = numbers(row, [f"A{i}-spline" for i in range(1, 5)])
        quasi = numbers(row, [f"A{i}-quasi" for i in range(1, 7)])
        lo, hi = numbers(row, ["Tmin", "Tmax"])
        if any(spline):

            def function(T: float, s: list[float] = spline, M: float = M) -> float:
                return R / M * sum(k * (T / 100) ** i for i, k in enumerate(s))
        elif liquid == "glycerol" and any(quasi):
            continue
        else:
            continue
        rows += values(liquid, "heat_capacity", lo, hi, function)
    rows.sort(key=lambda r: (r[0], float(r[2])))
    head = [
        "# source: Zabransky M., Ruzicka V., Majer V., Domalski E.S., Heat Capacity of Liquids,"
        " J. Phys. Chem. Ref. Data Monograph 6 (1996), and Supplement II (2010): cubic splines",
        SEEN + " (citation as named there)",
        "# uncertainty: classes I to V of the authors per block",
        NOTE,
    ]
    pure("Zabransky1996_alcohols", head, rows)


def vapour_pressures() -> None:
    rows: Rows = []
    for row in table("Vapor Pressure/Antoine Collection Poling.tsv"):
        liquid, _ = CAS[row["CAS"]]
        a, b, c, lo, hi = numbers(row, ["A", "B", "C", "Tmin", "Tmax"])
        rows += values(liquid, "vapour_pressure", lo, hi,
                       lambda T, a=a, b=b, c=c: 10 ** (a - b / (T + c)))  # fmt: skip
    pure(
        "Poling2001_alcohols",
        [
            "# source: Poling B.E., Prausnitz J.M., O'Connell J.P., The Properties of Gases and"
            " Liquids, 5th ed., McGraw-Hill 2001, appendix A: Antoine equation",
            SEEN,
            "# uncertainty: not stated in the copy",
            NOTE,
        ],
        rows,
    )
    rows = []
    for row in table("Vapor Pressure/Landolt_antoine_V20.tsv"):
        liquid, _ = CAS[row["CAS"]]
        a, b, c, lo, hi = numbers(row, ["A", "B", "C", "Tmin", "Tmax"])
        rows += values(
            liquid, "vapour_pressure", lo, min(hi, 500.0),
            lambda T, a=a, b=b, c=c: float(np.exp(a - b / (T + c))),
            np.arange(263.15, 500.0, 10.0),
        )  # fmt: skip
    pure(
        "LandoltBornstein1999_alcohols",
        [
            "# source: Landolt-Boernstein, New Series IV/20, Vapor Pressure of Chemicals"
            " (Dykyj J., Svoboda J., Wilhoit R.C., Frenkel M., Hall K.R.), Springer 1999-2001:"
            " Antoine equation",
            SEEN + " (file name Landolt_antoine_V20; authors and years from memory)",
            "# uncertainty: not stated in the copy",
            NOTE,
        ],
        rows,
    )


def crc() -> None:
    rows: Rows = []
    for row in table("Phase Change/CRC Handbook Heat of Vaporization.tsv"):
        liquid, M = CAS[row["CAS"]]
        for T, column in ((float(row["Tb"] or 0), "HvapTb"), (298.15, "Hvap298")):
            if row[column]:
                value = float(row[column]) / M
                rows.append([liquid, "heat_of_vaporisation", f"{T:.2f}", f"{value:.6g}", ""])
    name = "Heat Capacity/CRC Standard Thermodynamic Properties of Chemical Substances.tsv"
    for row in table(name):
        liquid, M = CAS[row["CAS"]]
        if row["Cpl"]:
            rows.append([liquid, "heat_capacity", "298.15", f"{float(row['Cpl']) / M:.6g}", ""])
    for row in table("Electrolytes/Permittivity (Dielectric Constant) of Liquids.tsv"):
        liquid, _ = CAS[row["CAS"]]
        names = list(row)
        T, value = row[names[2]], row[names[3]]
        # Printed as degC + 273.2.
        rows.append([liquid, "static_permittivity", f"{float(T) - 0.05:.2f}", value, ""])
    with (DATA / "Misc/CRC Handbook Organic RI.csv").open(encoding="utf-8") as handle:
        for line in handle:
            cas, *rest = line.split()
            if cas in CAS:
                rows.append([CAS[cas][0], "refractive_index", rest[1], rest[0], ""])
    for row in table("Misc/Physical Constants of Organic Compounds.csv"):
        # The copy glues the superscript temperature to the figure: 791.42 is 791.4 at 20 degC.
        text = row["rho"]
        digits, degrees = (text[:-2], 25) if text.endswith("25") else (text[:-1], 20)
        rows.append([CAS[row["CAS"]][0], "density", f"{degrees + 273.15:.2f}", digits, ""])
    head = [
        "# source: CRC Handbook of Chemistry and Physics, 95th ed. (2014): physical constants of"
        " organic compounds, enthalpy of vaporization, standard thermodynamic properties,"
        " permittivity of liquids",
        SEEN,
        "# uncertainty: last figure printed",
        "# note: molar figures divided by the molar mass; superscript temperatures separated",
    ]
    pure("CRCHandbook2014_alcohols", head, rows)


def lines() -> None:
    rows: Rows = []
    for row in table("Interface/Jasper-Lange.tsv"):
        liquid, _ = CAS[row["CAS"]]
        a, b, hi = numbers(row, ["a", "b", "Tmax"])
        rows += values(liquid, "surface_tension", 263.0, min(hi, 373.2),
                       lambda T, a=a, b=b: 1e-3 * (a - b * (T - 273.15)))  # fmt: skip
    pure(
        "Jasper1972_alcohols",
        [
            "# source: Jasper J.J., J. Phys. Chem. Ref. Data 1 (1972) 841-1010, straight line as"
            " reprinted in Lange's Handbook of Chemistry",
            SEEN,
            "# uncertainty: 0.1 to 0.3 mN/m (estimate)",
            NOTE,
        ],
        rows,
    )
    # Mulero, Cachadina, Sanjuan 2015 and Mulero, Cachadina, Parra 2012: N/m.
    mulero15 = {
        "1-propanol": (536.85, [-10.2192, 0.177644, 10.2509], [1.46876, 7.99999, 1.46348]),
        "ethylene_glycol": (719.0, [0.0719], [0.755]),
        "propylene_glycol": (674.0, [0.3038, -0.2619], [1.215, 1.451]),
    }
    rows = []
    for liquid, (Tc, s, n) in mulero15.items():
        rows += values(
            liquid, "surface_tension", 263.0, 400.0,
            lambda T, Tc=Tc, s=s, n=n: sum(
                a * (1 - T / Tc) ** b for a, b in zip(s, n, strict=True)),
        )  # fmt: skip
    pure(
        "Mulero2015_alcohols",
        [
            "# source: Mulero A., Cachadina I., Sanjuan E.L., Surface tension of alcohols. Data"
            " selection and recommended correlations, J. Phys. Chem. Ref. Data 44 (2015) 033104,"
            " doi:10.1063/1.4927858",
            "# seen: coefficients in one open-source process simulator that cites the paper;"
            " paper not seen",
            "# uncertainty: not seen; a fit to a selection of measured data of many authors",
            NOTE,
        ],
        rows,
    )
    rows = []
    for row in table("Interface/MuleroCachadinaParameters.tsv"):
        liquid, _ = CAS[row["CAS"]]
        c = numbers(row, ["sigma0", "n0", "sigma1", "n1", "sigma2", "n2"])
        (Tc,) = numbers(row, ["Tc"])
        rows += values(
            liquid, "surface_tension", 263.0, 400.0,
            lambda T, Tc=Tc, c=c: sum(
                c[i] * (1 - T / Tc) ** c[i + 1] for i in (0, 2, 4)),
        )  # fmt: skip
    pure(
        "Mulero2012_alcohols",
        [
            "# source: Mulero A., Cachadina I., Parra M.I., Recommended correlations for the"
            " surface tension of common fluids, J. Phys. Chem. Ref. Data 41 (2012) 043105",
            SEEN,
            "# uncertainty: not seen; a fit to a selection of data of many authors",
            NOTE,
        ],
        rows,
    )


class Helmholtz:
    """A multiparameter equation of state: residual terms, critical point, ideal heat capacity.

    Terms are n d^d t^t exp(-g d^c - e(d-eps)^2 - b(t-gam)^2), and the association form
    exp(-e(d-eps)^2 + 1/(b(t-gam)^2 + B)).
    """

    def __init__(self, M, Tc, rhoc, cp0, plain, powers, bells, links=(), gas=R):  # type: ignore[no-untyped-def]  # a table of numbers
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
    return dilute * second * 6.02214076e23 * (sigma * 1e-9) ** 3 * rho / M


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


SIMULATOR = (
    "# seen: coefficients in one open-source process simulator that cites the paper; evaluated"
    " here and checked against the check values given there; paper not seen"
)


def equations_of_state() -> None:
    from CoolProp.CoolProp import PropsSI

    grid = np.arange(263.15, 423.2, 10.0)
    eos: Rows = []
    viscosity: Rows = []
    conductivity: Rows = []
    for T in grid:
        rho = GLYCOL.density(T, 101325.0, 1113.0 - 0.7 * (T - 293.0))
        if T >= 273.0:
            eos.append(["ethylene_glycol", "density", f"{T:.2f}", f"{rho:.6g}", ""])
            eos.append(["ethylene_glycol", "speed_of_sound", f"{T:.2f}",
                        f"{GLYCOL.speed(T, rho):.6g}", ""])  # fmt: skip
            eos.append(["ethylene_glycol", "heat_capacity", f"{T:.2f}",
                        f"{GLYCOL.heat_capacity(T, rho):.6g}", ""])  # fmt: skip
        viscosity.append(["ethylene_glycol", "viscosity", f"{T:.2f}",
                          f"{glycol_viscosity(T, rho):.6g}", ""])  # fmt: skip
        conductivity.append(["ethylene_glycol", "thermal_conductivity", f"{T:.2f}",
                             f"{glycol_conductivity(T, rho):.6g}", ""])  # fmt: skip
    pure("Huber2022_alcohols", [
        "# source: equation of state of ethylene glycol in Huber M.L., Lemmon E.W., Bell I.H.,"
        " McLinden M.O., The NIST REFPROP database, Ind. Eng. Chem. Res. 61 (2022) 15449-15472,"
        " doi:10.1021/acs.iecr.2c01427",
        SIMULATOR, "# uncertainty: not seen", NOTE,
        "# note: stated from 300 K; below that extrapolated by the formula",
    ], eos)  # fmt: skip
    pure("Mebelli2021", [
        "# source: Mebelli M., Velliadou D., Assael M.J., Huber M.L., viscosity of ethane-1,2-diol,"
        " Int. J. Thermophys. 42 (2021) 116, doi:10.1007/s10765-021-02867-0; the same with"
        " Antoniadis K.D., thermal conductivity, Int. J. Thermophys. 42 (2021) 151,"
        " doi:10.1007/s10765-021-02904-y",
        SIMULATOR, "# uncertainty: not seen", NOTE, "# note: density from the equation of state of"
        " Huber 2022; conductivity without critical enhancement",
    ], viscosity + conductivity)  # fmt: skip
    rows: Rows = []
    for T in np.arange(253.15, 443.2, 10.0):
        rho = PropsSI("D", "T", T, "P", 101325.0, "PropyleneGlycol")
        rows.append(["propylene_glycol", "viscosity", f"{T:.2f}",
                     f"{propylene_glycol_viscosity(T, rho):.6g}", ""])  # fmt: skip
    pure("Velliadou2022", [
        "# source: Velliadou D., Antoniadis K.D., Assael M.J., Huber M.L., viscosity of"
        " propane-1,2-diol, Int. J. Thermophys. 43 (2022) 42, doi:10.1007/s10765-021-02970-2",
        SIMULATOR, "# uncertainty: not seen", NOTE,
        "# note: density from the equation of state of Eisenbach 2021 (CoolProp)",
    ], rows)  # fmt: skip
    rows = []
    for T in np.arange(253.15, 393.2, 10.0):
        rho = PROPANOL.density(T, 3e5, 803.0 - 0.8 * (T - 293.0))
        rows.append(["1-propanol", "density", f"{T:.2f}", f"{rho:.6g}", ""])
        rows.append(["1-propanol", "speed_of_sound", f"{T:.2f}",
                     f"{PROPANOL.speed(T, rho):.6g}", ""])  # fmt: skip
        rows.append(["1-propanol", "heat_capacity", f"{T:.2f}",
                     f"{PROPANOL.heat_capacity(T, rho):.6g}", ""])  # fmt: skip
    pure("Gao2025", [
        "# source: equation of state of 1-propanol by Gao K.H., Wu J.T., Lemmon E.W., in the"
        " supplement of Cui J.W., Gao K.H., Wu J.T., J. Phys. Chem. Ref. Data 54 (2025) 033106,"
        " doi:10.1063/5.0280205",
        SIMULATOR, "# uncertainty: not seen", NOTE, "# note: at 0.3 MPa",
    ], rows)  # fmt: skip


def ethanol_water() -> None:
    A = [9.982012300e2, -1.929769495e2, 3.891238958e2, -1.668103923e3, 1.352215441e4,
         -8.829278388e4, 3.062874042e5, -6.138381234e5, 7.470172998e5, -5.478461354e5,
         2.234460334e5, -3.903285426e4]  # fmt: skip
    B = [-2.0618513e-1, -5.2682542e-3, 3.6130013e-5, -3.8957702e-7, 7.1693540e-9, -9.9739231e-11]
    C = [
        [1.693443461530087e-1, -1.046914743455169e1, 7.196353469546523e1, -7.047478054272792e2,
         3.924090430035045e3, -1.210164659068747e4, 2.248646550400788e4, -2.605562982188164e4,
         1.852373922069467e4, -7.420201433430137e3, 1.285617841998974e3],
        [-1.193013005057010e-2, 2.517399633803461e-1, -2.170575700536993, 1.353034988843029e1,
         -5.029988758547014e1, 1.096355666577570e2, -1.422753946421155e2, 1.080435942856230e2,
         -4.414153236817392e1, 7.442971530188783],
        [-6.802995733503803e-4, 1.876837790289664e-2, -2.002561813734156e-1, 1.022992966719220,
         -2.895696483903638, 4.810060584300675, -4.672147440794683, 2.458043105903461,
         -5.411227621436812e-1],
        [4.075376675622027e-6, -8.763058573471110e-6, 6.515031360099368e-6,
         -1.515784836987210e-6],
        [-2.788074354782409e-8, 1.345612883493354e-8],
    ]  # fmt: skip

    def density(p: float, t: float) -> float:
        d = t - 20.0
        total = sum(a * p**k for k, a in enumerate(A)) + sum(
            b * d ** (k + 1) for k, b in enumerate(B)
        )
        for i, row in enumerate(C):
            total += sum(c * p ** (k + 1) for k, c in enumerate(row)) * d ** (i + 1)
        return total

    # Freezing curve of ethanol-water, rough and on the warm side [from memory]: only
    # compositions that stay liquid at the temperature.
    least = {-20.0: 0.35, -15.0: 0.30, -10.0: 0.20, -5.0: 0.12}
    rows = [
        ["ethanol", "water", "mass", f"{p:.2f}", f"{t + 273.15:.2f}", "density",
         f"{density(p, t):.2f}", ""]
        for t, low in least.items()
        for p in np.arange(0.05, 0.96, 0.05)
        if p >= low
    ]  # fmt: skip
    mixture("OIMLR22_cold", [
        "# source: OIML R 22 (1975), International alcoholometric tables, general formula",
        "# seen: computed from the 54 coefficients, seen in ten independent open-source programs",
        "# uncertainty: formula stated for -20 to 40 degC; 0.05 kg/m3 [from memory]",
        "# note: only compositions that stay liquid",
    ], rows)  # fmt: skip
    ends = [["ethanol", "density", f"{t + 273.15:.2f}", f"{density(1.0, t):.2f}", ""]
            for t in (-20.0, -15.0, -10.0, -5.0)]  # fmt: skip
    pure("OIMLR22_cold", [
        "# source: OIML R 22 (1975), general formula at 100 % by mass",
        "# seen: computed from the 54 coefficients, seen in ten independent open-source programs",
        "# uncertainty: 0.05 kg/m3 [from memory]",
    ], ends)  # fmt: skip
    rows = []
    for t in range(20, 51, 5):
        for w in (0.05, 0.1, 0.15, 0.2, 0.25, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9):
            d = t - 25.0
            sigma = (0.016045 - 6.43279e-5 * d) + (0.730407 - 0.00189571 * d) / (
                100 * w + 13.1225 - 0.011996 * d
            )
            rows.append(["ethanol", "water", "mass", f"{w:.2f}", f"{t + 273.15:.2f}",
                         "surface_tension", f"{sigma:.5f}", ""])  # fmt: skip
    mixture("Vazquez1995fit", [
        "# source: fit by a third party of Vazquez G., Alvarez E., Navaza J.M., J. Chem. Eng. Data"
        " 40 (1995) 611-614, doi:10.1021/je00019a016 (cited beside the fit)",
        "# seen: the two-variable formula in one open program; evaluated here",
        "# uncertainty: 1 % inside, up to 3.4 % towards pure ethanol, 0.5 % at pure water",
        NOTE,
    ], rows)  # fmt: skip


def glycerol_water() -> None:
    """Cheng 2008, above the temperatures of the table of 1951 that was seen."""

    def viscosity(w: float, t: float) -> float:
        water = 1.790 * np.exp((-1230 - t) * t / (36100 + 360 * t))
        glycerol = 12100 * np.exp((-1233 + t) * t / (9900 + 70 * t))
        a = 0.705 - 0.0017 * t
        b = (4.9 + 0.036 * t) * a**2.5
        alpha = 1 - w + a * b * w * (1 - w) / (a * w + b * (1 - w))
        return float(1e-3 * water**alpha * glycerol ** (1 - alpha))

    rows = [
        ["glycerol", "water", "mass", f"{w:.2f}", f"{t + 273.15:.2f}", "viscosity",
         f"{viscosity(w, t):.5g}", ""]
        for t in range(50, 101, 10)
        for w in (0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9, 0.95)
    ]  # fmt: skip
    mixture("Cheng2008", [
        "# source: Cheng N.-S., Formula for the viscosity of a glycerol-water mixture, Ind. Eng."
        " Chem. Res. 47 (2008) 3285-3288, doi:10.1021/ie071349z",
        "# seen: abstract on a web page, coefficients in several independent programs; evaluated"
        " here",
        "# uncertainty: 1.5 % median, 3.5 % at most against Segur & Oberstar from 0 to 40 degC",
        NOTE,
    ], rows)  # fmt: skip


if __name__ == "__main__":
    perry()
    vdi()
    zabransky()
    vapour_pressures()
    crc()
    lines()
    equations_of_state()
    ethanol_water()
    glycerol_water()
