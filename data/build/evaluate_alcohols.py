"""Values of published equations for alcohols and polyols, written to `data/published`.

    python data/build/evaluate_alcohols.py

Handbook coefficients are read from the data files of the open-source library chemicals (they
came from the handbooks named there); equations of state and reference correlations stand with
their coefficients in `alcohol_equations.py`. What comes out is a formula's value at round
temperatures, not a measurement, and every file says so.
"""

from __future__ import annotations

import csv
from collections.abc import Callable, Iterable
from pathlib import Path

import chemicals
import numpy as np
from alcohol_equations import (
    GLYCOL,
    PROPANOL,
    R,
    glycol_conductivity,
    glycol_viscosity,
    propylene_glycol_viscosity,
)
from convert_alcohols import mixture, pure

DATA = Path(chemicals.__file__).parent
SEEN = "# seen: coefficients read in the data files of the open-source library chemicals 1.5.2"
NOTE = "# note: values of the published formula at round temperatures, not measurements"
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
