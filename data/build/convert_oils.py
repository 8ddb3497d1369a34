"""Turn what was seen into `data/published`: oils, siloxanes, fluorinated liquids, fuels, propellants.

    python data/build/convert_oils.py FOLDER

FOLDER holds the reference tables (one CSV per source). Measured values pass through digit for
digit. Handbook and library equations are evaluated at a few temperatures: an evaluation stands
for its origin, once. What was typed from tables that were seen stands in `technical_tables.py`.
"""

from __future__ import annotations

import csv
import importlib
import math
import sys
import warnings
from collections.abc import Callable, Iterable, Sequence
from decimal import Decimal
from functools import partial
from pathlib import Path
from typing import Any

from compact_points import compact
from convert_organics import PUBLISHED, Row, reference, table
from technical_tables import CAS, CRC, CRC_PERMITTIVITY, FUELS, OIL_PAPERS, OILS, PARTS, TYPED

CHEMICALS = (
    "# seen: coefficients or values in the data files of the open-source library chemicals 1.5.2; "
    "the work itself was not seen"
)
THERMO = "# seen: coefficients in the open-source library thermo 0.6.1"
EVALUATED = "# note: rows marked equation are evaluations of the equation, made here"
KEYS = {cas: key for key, cas in CAS.items()}
UNITS = {"surface_tension": 0.001}  # tables print mN/m; larger than 1 means that
GRID = (263.15, 273.15, 283.15, 293.15, 303.15, 323.15, 348.15, 373.15)
COLD = (253.15, 263.15, 273.15, 283.15, 293.15, 303.15, 313.15, 323.15)


def write(name: str, head: Iterable[str], rows: Iterable[Sequence[str]]) -> None:
    unique = sorted(dict.fromkeys(tuple(row) for row in rows))
    if not unique:
        return
    path = PUBLISHED / "liquids" / f"{name}.csv"
    with path.open("w", encoding="utf-8", newline="") as handle:
        handle.writelines(f"{line}\n" for line in dict.fromkeys(head))
        writer = csv.writer(handle, lineterminator="\n")
        writer.writerow(["liquid", "property", "T_K", "value", "doi"])
        writer.writerows(unique)
    compact(path)


def kelvin(celsius: float) -> str:
    return str(Decimal(str(celsius)) + Decimal("273.15"))


def typed(rows: Iterable[tuple[str, str, float, str, str]]) -> list[list[str]]:
    """Typed rows in SI; a kinematic viscosity becomes dynamic by a density of the same list."""
    rows = list(rows)
    densities: dict[str, list[tuple[float, float]]] = {}
    for liquid, prop, T, value, _ in rows:
        if prop == "density":
            densities.setdefault(liquid, []).append((T, float(value)))
    found = []
    for liquid, prop, T, value, doi in rows:
        text = value
        if prop == "surface_tension" and float(value) > 1.0:
            text = f"{Decimal(value) / 1000}"
        if prop == "kinematic_viscosity":
            near = sorted(densities[liquid], key=lambda pair: abs(pair[0] - T))[0]
            rho = near[1] * (1.0 - EXPANSION.get(liquid, 7.3e-4) * (T - near[0]))
            prop, text = "viscosity", f"{1e-6 * float(value) * rho:.4g}"
        found.append([liquid, prop, kelvin(T), text, doi])
    return found


# Relative change of density per kelvin, only to turn kinematic into dynamic viscosity.
EXPANSION = {"jet_fuel": 9.0e-4, "ethoxyperfluorobutane": 0.0}


def thermo_curve(cls: str, key: str, method: str) -> tuple[Callable[[float], float], float, float]:
    """One named method of the library thermo, with its limits."""
    thermo = importlib.import_module("thermo")
    chemicals = importlib.import_module("chemicals")
    cas = CAS[key]
    with warnings.catch_warnings():
        warnings.simplefilter("ignore")
        found: Any = getattr(thermo, cls)(
            CASRN=cas, MW=chemicals.MW(cas), Tc=chemicals.Tc(cas), Pc=chemicals.Pc(cas)
        )
    if method not in found.all_methods:
        return (lambda _: math.nan), 1.0, 0.0
    low, high = found.T_limits[method]
    return (lambda T: float(found.calculate(T, method))), low, high


def converted(f: Callable[[float], float], molar: float, power: float, T: float) -> float:
    return float((f(T) / molar) ** power)


def evaluated(
    key: str,
    prop: str,
    f: Callable[[float], float],
    low: float,
    high: float,
    grid: Sequence[float] = GRID,
) -> list[list[str]]:
    inside = [T for T in grid if low - 0.1 <= T <= high + 0.1]
    return [[key, prop, f"{T:.2f}", f"{f(T):.5g}", "equation"] for T in inside]


# --- handbooks in the data files of chemicals ------------------------------------------------
def crc(part: str) -> None:
    rows = []
    index = table_csv("Misc", "CRC Handbook Organic RI.csv")
    heat = table("Phase Change", "CRC Handbook Heat of Vaporization.tsv")
    for key in PARTS[part]:
        molar = molar_mass(key)
        if key in CRC:
            density, celsius = CRC[key]
            rows.append([key, "density", kelvin(celsius), f"{density}", ""])
        if key in CRC_PERMITTIVITY:
            value, T = CRC_PERMITTIVITY[key]
            rows.append([key, "static_permittivity", f"{T}", f"{value}", "spot"])
        if CAS[key] in index:
            row = index[CAS[key]]
            rows.append([key, "refractive_index", row["RIT"], row["RI"], ""])
        if CAS[key] in heat:
            row = heat[CAS[key]]
            for column, T_text in (("HvapTb", row["Tb"]), ("Hvap298", "298.15")):
                if row[column]:
                    value = float(row[column]) / molar
                    rows.append([key, "heat_of_vaporisation", T_text, f"{value:.5g}", ""])
        cp, _, _ = thermo_curve("HeatCapacityLiquid", key, "CRCSTD")
        if not math.isnan(cp(298.15)):
            rows.append([key, "heat_capacity", "298.15", f"{cp(298.15) / molar:.5g}", ""])
    head = [
        "# source: CRC Handbook of Chemistry and Physics, 95th ed. (2014): tables Physical "
        "Constants of Organic Compounds, Permittivity of Liquids, Enthalpy of Vaporization, "
        "Standard Thermodynamic Properties",
        CHEMICALS + "; the copies do not all name the edition",
        "# uncertainty: not stated in the copy",
        "# note: density: printed in g/cm3 with the temperature as a superscript, which the copy "
        "appends to the digits; molar values divided by the molar mass here",
    ]
    write(f"CRCHandbook2014_{part}", head, rows)


def library() -> Path:
    """The folder of the library chemicals."""
    return Path(str(importlib.import_module("chemicals").__file__)).parent


def table_csv(folder: str, file: str) -> dict[str, Row]:
    text = (library() / folder / file).read_text(encoding="utf-8").splitlines()
    delimiter = "\t" if "\t" in text[0] else ","
    return {row["CAS"]: row for row in csv.DictReader(text, delimiter=delimiter)}


def molar_mass(key: str) -> float:
    return float(importlib.import_module("chemicals").MW(CAS[key])) / 1000.0


def jasper(part: str) -> None:
    lines = table("Interface", "Jasper-Lange.tsv")
    rows = []
    for key in PARTS[part]:
        row = lines.get(CAS[key])
        if row is None:
            continue
        a, b = Decimal(row["a"]), Decimal(row["b"])
        low = float(row["Tmin"] or 283.15)
        high = float(row["Tmax"] or 373.15)
        for T in COLD if part == "propellants" else GRID:
            if low - 0.1 <= T <= high + 0.1:
                value = (a - b * (Decimal(str(T)) - Decimal("273.15"))) / 1000
                rows.append([key, "surface_tension", f"{T:.2f}", f"{value:.6f}", ""])
    head = [
        "# source: Jasper J.J., The Surface Tension of Pure Liquid Compounds, J. Phys. Chem. Ref. "
        "Data 1 (1972) 841-1010, as reprinted in Lange's Handbook",
        CHEMICALS,
        "# uncertainty: not stated in the copy",
        "# note: the straight line, evaluated here inside its range (triacetin: range not in the "
        "copy)",
    ]
    write(f"Jasper1972_{part}", head, rows)


def thermo_file(
    source: str, part: str, wanted: Iterable[tuple[str, str, str, str]], head: Sequence[str],
    grid: Sequence[float] = GRID, top: float = 375.0,
) -> None:  # fmt: skip
    """Rows of (key, property, class, method) of the library thermo."""
    rows = []
    for key, prop, cls, method in wanted:
        f, low, high = thermo_curve(cls, key, method)
        per_mole = prop in ("density", "heat_of_vaporisation", "heat_capacity")
        molar = molar_mass(key) if per_mole else 1.0
        power = -1.0 if prop == "density" else 1.0  # a molar volume, or per mole
        curve = partial(converted, f, molar, power)
        rows += evaluated(key, prop, curve, low, min(high, top), grid)
    write(f"{source}_{part}", head, rows)


SIGMA, ETA, K = "SurfaceTension", "ViscosityLiquid", "ThermalConductivityLiquid"
RHO, P, H = "VolumeLiquid", "VaporPressure", "EnthalpyVaporization"


def libraries() -> None:
    fits = [
        "# source: Bell C. and contributors, the open-source library thermo 0.6.1, correlations "
        "labelled Fit 2023; the measurements behind them are not named there",
        THERMO,
        "# uncertainty: not stated",
        EVALUATED,
    ]
    for part in ("oils", "fluorinated"):
        wanted = [(key, "surface_tension", SIGMA, "Fit 2023") for key in PARTS[part]]
        wanted += [(key, "thermal_conductivity", K, "Fit 2023") for key in PARTS[part]]
        thermo_file("BellThermo2023", part, wanted, fits)
    models = [
        "# source: Lemmon E.W., Bell I.H., Huber M.L., McLinden M.O., NIST Standard Reference "
        "Database 23 (REFPROP), version 10.0, 2018: transport models for the saturated liquid",
        THERMO + ", correlations labelled REFPROP_FIT, fitted there to that program's values",
        "# uncertainty: not in the copy; the program's models of such liquids are good to a few "
        "percent (from memory)",
        EVALUATED,
    ]
    esters = ("methyl_oleate", "methyl_palmitate")
    for part, keys in (
        ("oils", esters), ("siloxanes", PARTS["siloxanes"]), ("fluorinated", ("perfluorohexane",)),
    ):  # fmt: skip
        wanted = [(key, "viscosity", ETA, "REFPROP_FIT") for key in keys]
        wanted += [(key, "thermal_conductivity", K, "REFPROP_FIT") for key in keys]
        if part == "fluorinated":
            wanted += [(key, "surface_tension", SIGMA, "REFPROP_FIT") for key in keys]
        thermo_file("Lemmon2018", part, wanted, models)
    landolt = [
        "# source: Landolt-Boernstein, New Series IV/20, Vapor Pressure of Chemicals, Springer "
        "1999-2001, Antoine constants",
        CHEMICALS,
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    for part in PARTS:
        # The copy's row of triacetin is about a thousand times too high (150 Pa at 20 degC).
        wanted = [(key, "vapour_pressure", P, "LANDOLT") for key in PARTS[part]
                  if key != "triacetin"]  # fmt: skip
        thermo_file("LandoltBornstein1999", part, wanted, landolt,
                    COLD if part == "propellants" else GRID)  # fmt: skip
    mulero = [
        "# source: Mulero A., Cachadina I., Recommended Correlations for the Surface Tension of "
        "Several Fluids Included in the REFPROP Program, J. Phys. Chem. Ref. Data 43 (2014) "
        "023104, doi:10.1063/1.4878755",
        CHEMICALS + "; the same in CoolProp 8.0.0, which names the paper",
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    for part, keys in (
        ("oils", esters), ("siloxanes", PARTS["siloxanes"]), ("propellants", ("hfo-1234ze",)),
    ):  # fmt: skip
        wanted = [(key, "surface_tension", SIGMA, "REFPROP") for key in keys]
        thermo_file("Mulero2014", part, wanted, mulero, COLD if part == "propellants" else GRID)
    zabransky = [
        "# source: Zabransky M., Ruzicka V., Domalski E.S., Heat Capacity of Liquids: Critical "
        "Review and Recommended Values, J. Phys. Chem. Ref. Data, with supplement",
        CHEMICALS,
        "# uncertainty: classes III to V (1 % to more than 5 %)",
        EVALUATED,
    ]
    cp = "HeatCapacityLiquid"
    for part, keys in (
        ("oils", ("limonene", "oleic_acid", "triolein", "dibutyl_phthalate", "methyl_palmitate")),
        ("siloxanes", PARTS["siloxanes"]),
    ):
        wanted = [(key, "heat_capacity", cp, "ZABRANSKY_SPLINE_C") for key in keys]
        thermo_file("Zabransky1996", part, wanted, zabransky)


def propellants() -> None:
    perry = [
        "# source: Perry's Chemical Engineers' Handbook, 8th ed. (2008), tables 2-8, 2-32, 2-150, "
        "2-313, 2-315",
        CHEMICALS,
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    names = PARTS["propellants"]
    kinds = ((RHO, "density"), (ETA, "viscosity"), (P, "vapour_pressure"),
             (H, "heat_of_vaporisation"), (K, "thermal_conductivity"))  # fmt: skip
    wanted = [(key, prop, cls, "DIPPR_PERRY_8E") for key in names for cls, prop in kinds]
    thermo_file("PerryGreen2008", "propellants", wanted, perry, COLD)
    ppds = (*kinds, (SIGMA, "surface_tension"))
    wanted = [(key, prop, cls, "VDI_PPDS") for key in names for cls, prop in ppds]
    vdi = [
        "# source: VDI Heat Atlas, 2nd ed. (2010), PPDS equations (section D3)",
        CHEMICALS,
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    thermo_file("VDIHeatAtlas2010", "propellants", wanted, vdi, COLD)
    data: Any = importlib.import_module("json").loads(
        (library() / "Misc" / "VDI Saturation Compounds Data.json").read_text(encoding="utf-8")
    )
    rows = []
    for key in ("hfa-134a", "hfa-152a"):
        rows += vdi_table(key, data[CAS[key]])
    # Its other columns equal the formulations to all digits: no second source.
    tension = [row for row in vdi_table("propane", data[CAS["propane"]]) if "tension" in row[1]]
    rows += tension
    write("VDIHeatAtlas2010_table_propellants", [
        "# source: VDI Heat Atlas, 2nd ed. (2010), saturation tables (section D3)",
        CHEMICALS, "# uncertainty: not stated in the copy; tables rounded to 3 or 4 figures",
    ], rows)  # fmt: skip


def vdi_table(key: str, entry: Any) -> list[list[str]]:
    columns = {"Density (l)": "density", "Mu (l)": "viscosity", "sigma": "surface_tension",
               "P": "vapour_pressure", "K (l)": "thermal_conductivity"}  # fmt: skip
    found = []
    for name, prop in columns.items():
        values = entry.get(name)
        if not values:
            continue
        for T, value in zip(entry["T"], values, strict=True):
            if value is not None and 250.0 <= T <= 325.0:
                found.append([key, prop, f"{T}", f"{value:.5g}", "table"])
    return found


# --- library of secondary fluids, reference folder, typed tables -----------------------------
def secondary_fluids() -> None:
    props: Any = importlib.import_module("CoolProp.CoolProp").PropsSI
    note = "# note: evaluated here at 101325 Pa; rows marked equation"

    def rows(key: str, fluid: str, kinds: dict[str, str], grid: Sequence[float]) -> list[list[str]]:
        return [
            [key, prop, f"{T:.2f}", f"{props(q, 'T', T, 'P', 101325.0, f'INCOMP::{fluid}'):.5g}",
             "equation"]
            for q, prop in kinds.items() for T in grid
        ]  # fmt: skip

    four = {"D": "density", "V": "viscosity", "L": "thermal_conductivity", "C": "heat_capacity"}
    write("HeatTransferFluid800_siloxanes", [
        "# source: maker's table of a heat-transfer fluid, polydimethylsiloxane of nominally 9.8 "
        "mm2/s at 25 degC (fluid S800 of the library CoolProp 8.0.0)",
        "# seen: fit in that library; the maker's table not seen",
        "# uncertainty: not stated; its viscosity at 25 degC is 7 % above the nominal grade", note,
    ], rows("polydimethylsiloxane_10", "S800", four, GRID))  # fmt: skip
    grid = (253.15, 273.15, 293.15, 298.15, 313.15, 328.15)
    ether = rows("methoxyperfluorobutane", "HFE2", {"D": "density", "V": "viscosity"}, grid)
    density = {row[2]: float(row[3]) for row in ether if row[1] == "density"}
    for row in ether:
        if row[1] == "viscosity":
            row[3] = f"{float(row[3]) * 1e-3 * density[row[2]]:.5g}"
    write("SecondaryFluidHFE_fluorinated", [
        "# source: fluid HFE2 (hydrofluoroether of methoxyperfluorobutane) of the library "
        "CoolProp 8.0.0, compiled by M.J. Skovrup from the maker's data",
        "# seen: fit in that library; the maker's data not seen",
        "# uncertainty: not stated", note,
        "# note: the library gives the kinematic viscosity (0.372 at 25 degC, in mm2/s) under the "
        "name of the dynamic one (0.372 mPa s, 36 % below the maker's 0.58); multiplied here by "
        "the density",
    ], ether)  # fmt: skip


def silicone_rule() -> None:
    """log10(nu/nu25) = 763/T - 2.559, with the density at 25 degC falling by 0.095 % per kelvin."""
    densities = {"5": 915.0, "10": 935.0, "20": 950.0, "50": 960.0, "100": 964.0, "350": 970.0,
                 "500": 971.0, "1000": 971.0}  # fmt: skip
    rows = []
    for grade, rho in densities.items():
        for T in (273.15, 283.15, 293.15, 298.15, 313.15, 333.15, 353.15, 373.15):
            nu = float(grade) * 1e-6 * 10.0 ** (763.0 / T - 2.559)
            eta = nu * rho * (1.0 - 9.5e-4 * (T - 298.15))
            rows.append([f"polydimethylsiloxane_{grade}", "viscosity", f"{T:.2f}", f"{eta:.5g}",
                         "equation"])  # fmt: skip
    write("SiliconeRule_siloxanes", [
        "# source: rule for the kinematic viscosity of polydimethylsiloxane oils, log10(nu/nu25) "
        "= 763/T - 2.559, in a public heat-transfer program (class psf5_props, for 5 mm2/s)",
        "# seen: the program; that makers give the same rule for all grades is from memory",
        "# uncertainty: not stated; grades are sold to 5 to 10 %",
        "# note: evaluated here for the nominal grades, times the density (25 degC: see "
        "SiliconePrograms, Ji2021; 964 kg/m3 for 100 mm2/s from a trade article, 971 for 500 and "
        "1000 from memory), which falls by 0.095 % per kelvin as that of the heat-transfer fluid",
    ], rows)  # fmt: skip


def commercial_perfluorohexane() -> None:
    """Fits for commercial perfluorohexane (isomers), t in degC."""
    rows = []
    for t in (0.0, 10.0, 20.0, 25.0, 30.0, 40.0, 50.0):
        T = f"{t + 273.15:.2f}"
        rho = 1755.59 - 3.101e-4 * t**3 + 4.503e-2 * t**2 - 3.954 * t
        nu = 1e-7 * (-4.102e-6 * t**3 + 8.759e-4 * t**2 - 8.259e-2 * t + 5.409)
        sigma = 4.2705e-2 * (1.0 - (t + 273.5) / 451.65) ** 1.2532
        values = {
            "density": rho, "viscosity": nu * rho, "surface_tension": sigma,
            "thermal_conductivity": 9.0672e-2 - 1.168e-4 * (t + 273.15),
            "heat_capacity": 589.18 + 1.5443 * (t + 273.15),
            "heat_of_vaporisation": -0.4984 * t**2 - 230.89 * t + 99179.99,
        }  # fmt: skip
        rows += [["perfluorohexane", k, T, f"{v:.5g}", "equation"] for k, v in values.items()]
    write("PisaReview_fluorinated", [
        "# source: fits for commercial perfluorohexane (mixed isomers) after a literature study at "
        "the University of Pisa, as a public boiling program gives them",
        "# seen: the program; the study itself not seen",
        "# uncertainty: not stated", EVALUATED,
        "# note: viscosity = kinematic viscosity times density, formed here",
    ], rows)  # fmt: skip
    rows = []
    for T_K in (293.15, 298.15, 303.15, 313.15):
        values = {
            "density": 2499.0 - 2.16 * T_K,
            "viscosity": 0.0429 - 0.162e-3 * T_K + 1.08e-7 * T_K**2,
            "thermal_conductivity": 0.086 - 6.9e-5 * T_K,
            "heat_capacity": 590.0 + 1.55 * T_K,
        }  # fmt: skip
        rows += [["perfluorotributylamine", k, f"{T_K:.2f}", f"{v:.5g}", "equation"]
                 for k, v in values.items()]  # fmt: skip
    write("Chun2026_fluorinated", [
        "# source: Chun et al. (2026), table 3: fits for a commercial coolant that is mostly "
        "perfluorotributylamine, as a public simulation cites it",
        "# seen: the program; the paper itself not seen",
        "# uncertainty: not stated; the fit for the viscosity cannot hold far above 40 degC",
        EVALUATED,
    ], rows)  # fmt: skip


def fuels(folder: Path) -> None:
    names = {
        "diesel (2002)": "diesel", "diesel fuel (Canada)": "diesel",
        "diesel fuel (Southern USA 1994)": "diesel", "diesel fuel (Southern USA 1997)": "diesel",
        "diesel, ultra-low sulfur (2006)": "diesel", "diesel, ultra-low sulfur, summer": "diesel",
        "gasoline (leaded)": "gasoline", "aviation gasoline 100LL": "gasoline",
        "jet fuel A / A-1": "jet_fuel", "jet fuel JP-5": "jet_fuel",
        "castor oil": "castor_oil", "soybean oil": "soybean_oil",
    }  # fmt: skip
    kinds = {"density_kg_m3": "density", "viscosity_Pa_s": "viscosity",
             "surface_tension_air_N_m": "surface_tension"}  # fmt: skip
    head, given = reference(folder, "oils_fuels_adios")
    rows: dict[str, list[list[str]]] = {"fuels": [], "oils": []}
    for row in given:
        liquid, prop = names.get(row["oil"]), kinds.get(row["quantity"])
        if liquid and prop:
            part = "oils" if liquid.endswith("oil") else "fuels"
            rows[part].append([liquid, prop, row["T_K"], row["value"], row["record"]])
    for part, found in rows.items():
        write(f"AdiosDatabase_{part}", head, found)
    write("Edwards2017_fuels", [
        "# source: three jet fuels of the National Jet Fuels Combustion Program (Jet A POSF10325, "
        "JP-8 POSF10264, JP-5 POSF10289), Edwards T. (2017), doi:10.2514/6.2017-0146, and Edwards "
        "(2020)",
        "# seen: data files of a public fuel library that names these reports; reports not seen",
        "# uncertainty: not in the copy; figures read from plots, partly",
        "# note: viscosity = kinematic viscosity times density of the same fuel, formed here",
    ], typed(FUELS))  # fmt: skip
    diesel = []
    for T in (273.15, 283.15, 293.15, 298.15, 313.15, 333.15, 353.15):
        t = T - 273.15
        for prop, value in (("density", 840.3 - 0.66331 * t),
                            ("viscosity", 1e-3 * math.exp(0.1539 - 1362.0 / T + 472500.0 / T**2)),
                            ("surface_tension", 1e-3 * (43.2 - 0.06043 * T))):  # fmt: skip
            diesel.append(["diesel", prop, f"{T:.2f}", f"{value:.5g}", "equation"])
    write("DieselProgram_fuels", [
        "# source: fits for diesel fuel in a public program on sprays of algal biodiesel; their "
        "origin is not given there",
        "# seen: the program", "# uncertainty: not stated", EVALUATED,
    ], diesel)  # fmt: skip


def handed_over(folder: Path) -> None:
    """Rows of the reference folder."""
    words = {"squalane": "squalane", "methyl oleate": "methyl_oleate",
             "dibutyl phthalate": "dibutyl_phthalate"}  # fmt: skip
    head, given = reference(folder, "pure_viscosity_vs_temperature_dataset")
    own: list[list[str]] = []
    book: list[list[str]] = []
    for row in given:
        if row["substance"] in words:
            cell = [words[row["substance"]], "viscosity", row["T_K"], row["viscosity_Pa_s"], ""]
            apart = row["T_K"] in ("288.15", "298.15", "313.15")
            apart = apart and row["substance"] != "dibutyl phthalate"
            (own if apart else book).append(cell)
    write("Viswanath2007_oils", head, book)
    write("AutomatedViscometer_oils", [
        "# source: own measurements of the study Thermodynamics-informed machine learning to "
        "predict temperature-dependent properties of fluids, at 288.15, 298.15 and 313.15 K",
        "# seen: data file of its public repository, in which these rows stand apart; that they "
        "are its own automated measurements is a conclusion from their form",
        "# uncertainty: not stated",
    ], own)  # fmt: skip
    head, given = reference(folder, "pure_viscosity_thermoml_295_304K")
    rows = [["triacetin", "viscosity", r["T_K"], r["viscosity_Pa_s"], r["doi"]]
            for r in given if r["substance"] == "triacetin"]  # fmt: skip
    write("ThermoMLArchive_oils", head, rows)
    for part in ("oils", "fluorinated"):
        rows = []
        for name in ("pure_surface_tension_ml_dataset", "pure_surface_tension_ml_dataset_2"):
            head, given = reference(folder, name)
            for r in given:
                key = KEYS.get(r["cas"])
                if key in PARTS[part]:
                    T = Decimal(r["T_K"])
                    T += Decimal("0.15") if "." not in r["T_K"] else 0
                    rows.append([str(key), "surface_tension", f"{T}", r["surface_tension_N_m"], ""])
        note = "# note: 0.15 K added here to temperatures that were rounded to whole kelvins"
        write(f"SchmeddingZuend_{part}", [*head, note], rows)
    head, given = reference(folder, "pure_liquids_thermoml")
    rows = []
    props: Any = importlib.import_module("CoolProp.CoolProp").PropsSI
    for r in given:
        if r["substance"] != "HFA-227ea" or float(r["T_K"]) > 335.0:
            continue
        value, prop = r["value"], "surface_tension"
        if r["quantity"].startswith("kinematic"):
            rho = props("D", "T", float(r["T_K"]), "Q", 0, "R227EA")
            value, prop = f"{float(value) * rho:.4g}", "viscosity"
        rows.append(["hfa-227ea", prop, r["T_K"], value, r["reference"]])
    note = "# note: viscosity = kinematic viscosity times the density of the equation of state"
    write("ThermoMLArchive_propellants", [*head, note], rows)


def squalane() -> None:
    """ChemSep's equations for squalane."""
    rows = evaluated(
        "squalane", "density",
        lambda T: 422.81328 * 0.15996 / 0.26223 ** (1.0 + (1.0 - T / 863.0) ** 0.38604),
        235.0, 400.0,
    )  # fmt: skip
    rows += evaluated(
        "squalane", "surface_tension",
        lambda T: -0.068044 + math.exp(-20.425 / T - 1.8668 - 0.0015438 * T + 7.0904e-7 * T * T),
        235.0, 400.0,
    )  # fmt: skip
    rows += evaluated(
        "squalane", "heat_capacity",
        lambda T: (-38276 + math.exp(-113.46 / T + 13.728 + 0.001186 * T - 3.7363e-7 * T * T))
        / 422.81328, 300.0, 400.0,
    )  # fmt: skip
    rows += evaluated(
        "squalane", "thermal_conductivity",
        lambda T: -0.045427 + math.exp(7.6198 / T - 1.8982 - 2.6051e-4 * T - 5.9557e-7 * T * T),
        235.0, 400.0,
    )  # fmt: skip
    write("ChemSep2022_oils", [
        "# source: ChemSep pure component data, version 8.32 (Kooijman H.A., Taylor R.)",
        "# seen: its file as it ships with the open-source library chemicals 1.5.2",
        "# uncertainty: not stated", EVALUATED,
    ], rows)  # fmt: skip


def main(folder: Path) -> None:
    """Write every file."""
    for part in PARTS:
        crc(part)
        jasper(part)
    libraries()
    propellants()
    secondary_fluids()
    silicone_rule()
    commercial_perfluorohexane()
    fuels(folder)
    handed_over(folder)
    squalane()
    for name, (head, given) in TYPED.items():
        write(name, head, typed(given))
    converted = typed(with_densities(OILS))
    for paper, citation in OIL_PAPERS.items():
        write(f"{paper}_oils", [
            f"# source: {citation}",
            "# seen: rows collected in the tables of a public site on straight vegetable oil; the "
            "paper itself was not seen",
            "# uncertainty: not stated; kinematic viscosities are rounded to whole mm2/s",
            "# note: viscosity = kinematic viscosity times a density of the same oil, formed here "
            "(0.073 % per kelvin)",
            "# note: temperature of surface tension not in the copy, taken as 25 degC",
        ], [[*row[:4], ""] for row in converted if row[4] == paper])  # fmt: skip


def with_densities(
    rows: Iterable[tuple[str, str, float, str, str]],
) -> list[tuple[str, str, float, str, str]]:
    """Olive oil has no density in those tables: that of the piping table."""
    found = list(rows)
    return [*found, ("olive_oil", "density", 20.0, "910", "PipingTable")]


if __name__ == "__main__":
    main(Path(sys.argv[1]))
