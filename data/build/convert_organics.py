"""Turn reference tables and handbook coefficients into `data/published`: the organic liquids.

    python data/build/convert_organics.py FOLDER

FOLDER holds one CSV per source, each with `# source:`, `# seen:`, `# uncertainty:` and `# note:`
lines; measured values pass through as text, digit for digit. Handbook equations come from the
coefficient tables that ship with chemicals 1.5.2 and are evaluated at a few temperatures: an
evaluation stands for its handbook, once. `organics.csv` lists the liquids.
"""

from __future__ import annotations

import csv
import importlib.util
import math
import re
import sys
from collections.abc import Callable, Iterable, Sequence
from decimal import Decimal
from functools import cache
from pathlib import Path
from typing import Any

from compact_points import compact

HERE = Path(__file__).resolve().parent
PUBLISHED = HERE.parent / "published"
PART = "organics"
R = 8.31446261815324
LIQUID = ["liquid", "property", "T_K", "value", "doi"]
QUANTITIES = {
    "density_kg_m3": "density",
    "viscosity_Pa_s": "viscosity",
    "surface_tension_N_m": "surface_tension",
    "speed_of_sound_m_s": "speed_of_sound",
    "relative_permittivity": "static_permittivity",
    "electrical_conductivity_S_m": "electrical_conductivity",
    "vapour_pressure_Pa": "vapour_pressure",
    "diffusivity_in_air_m2_s": "diffusivity_in_air",
}
CHEMICALS = (
    "# seen: coefficients or values in the data files of the open-source library chemicals 1.5.2; "
    "the work itself was not seen"
)
EVALUATED = "# note: rows marked equation are evaluations of the printed equation, made here"
Row = dict[str, str]


def subjects() -> list[Row]:
    """The liquids of `organics.csv`."""
    with (HERE / "organics.csv").open(encoding="utf-8", newline="") as handle:
        return list(csv.DictReader(handle))


SUBJECTS = subjects()
KEYS = {row["reference_names"]: row["key"] for row in SUBJECTS}
CAS = {row["key"]: row["cas"] for row in SUBJECTS}


def reference(folder: Path, name: str) -> tuple[list[str], list[Row]]:
    """Comment lines and rows of one reference table."""
    lines = (folder / f"{name}.csv").read_text(encoding="utf-8").splitlines()
    body = [line for line in lines if line.strip() and not line.startswith("#")]
    head = [line for line in lines if line.startswith("#") and "taken out" not in line]
    return head, list(csv.DictReader(body))


@cache
def table(folder: str, file: str, cas: str = "CAS") -> dict[str, Row]:
    """A coefficient table of chemicals, by CAS number."""
    found = importlib.util.find_spec("chemicals")
    assert found is not None
    assert found.submodule_search_locations
    path = Path(found.submodule_search_locations[0]) / folder / file
    with path.open(encoding="utf-8", newline="") as handle:
        return {row[cas]: row for row in csv.DictReader(handle, delimiter="\t")}


def numbers(row: Row, names: Iterable[str]) -> list[float]:
    return [float(row[name] or 0.0) for name in names]


@cache
def identifiers() -> dict[str, tuple[str, str]]:
    """CAS number -> formula and molar mass [g/mol] as printed."""
    found = importlib.util.find_spec("chemicals")
    assert found is not None
    assert found.submodule_search_locations
    folder = Path(found.submodule_search_locations[0]) / "Identifiers"
    known: dict[str, tuple[str, str]] = {}
    for file in ("pubchem small", "example user db", "pubchem large"):
        for line in (
            (folder / f"chemical identifiers {file}.tsv").read_text(encoding="utf-8").splitlines()
        ):
            _, cas, formula, mass, _ = line.split("\t", 4)
            known.setdefault(cas, (formula, mass))
    return known


def molar_mass(key: str) -> float:
    return float(identifiers()[CAS[key]][1]) / 1000.0


@cache
def melting_point(key: str) -> float:
    row = table_csv("Misc", "Physical Constants of Organic Compounds.csv").get(CAS[key])
    return float(row["Tm"]) if row and row["Tm"] else 0.0


@cache
def table_csv(folder: str, file: str) -> dict[str, Row]:
    found = importlib.util.find_spec("chemicals")
    assert found is not None
    assert found.submodule_search_locations
    path = Path(found.submodule_search_locations[0]) / folder / file
    text = path.read_text(encoding="utf-8")
    mark = "\t" if "\t" in text.splitlines()[0] else ","
    return {row["CAS"]: row for row in csv.DictReader(text.splitlines(), delimiter=mark)}


def grid(key: str, low: float, high: float, count: int = 7) -> list[float]:
    """A few round temperatures inside a range, in the window from 253.15 to 413.15 K."""
    low = max(low, melting_point(key), 253.0)
    high = min(high, 413.2)
    inside = [253.15 + 10.0 * i for i in range(17) if low <= 253.15 + 10.0 * i <= high]
    if len(inside) <= count:
        return inside
    step = (len(inside) - 1) / (count - 1)
    return [inside[round(i * step)] for i in range(count)]


def evaluated(
    key: str,
    prop: str,
    f: Callable[[float], float],
    low: float,
    high: float,
    count: int = 7,
) -> list[list[str]]:
    rows = []
    for T in grid(key, low, high, count):
        value = f(T)
        # A corrupt row of constants gives a viscosity that no liquid has.
        if math.isfinite(value) and 0.0 < value < (1e3 if prop == "viscosity" else math.inf):
            rows.append([key, prop, f"{T:.2f}", f"{value:.5g}", "equation"])
    return rows


def write(source: str, head: Iterable[str], rows: Iterable[Sequence[str]]) -> None:
    unique = sorted(dict.fromkeys(tuple(row) for row in rows))
    if not unique:
        return
    path = PUBLISHED / "liquids" / f"{source}_{PART}.csv"
    with path.open("w", encoding="utf-8", newline="") as handle:
        handle.writelines(f"{line}\n" for line in dict.fromkeys(head))
        writer = csv.writer(handle, lineterminator="\n")
        writer.writerow(LIQUID)
        writer.writerows(unique)
    compact(path)


def atmospheric(row: Row) -> bool:
    """Whether a row of the archive was measured near one atmosphere (or does not say)."""
    kPa = float(row.get("pressure_kPa") or 0.0) or float(row.get("pressure_Pa") or 0.0) / 1000
    return kPa == 0.0 or 70.0 <= kPa <= 120.0


def wide(rows: Iterable[Row], mark: str = "") -> list[list[str]]:
    """Rows of our liquids from a table with one column per quantity."""
    found = []
    for row in rows:
        key = KEYS.get(row.get("substance") or row.get("vapour", ""))
        if key is None or not row.get("T_K") or row.get("flag") or not atmospheric(row):
            continue
        for column, prop in QUANTITIES.items():
            if row.get(column):
                source = row.get("doi") or row.get("reference") or mark
                found.append([key, prop, row["T_K"], row[column], source])
    return found


def archive(folder: Path) -> None:
    """The rows of the ThermoML archive."""
    rows: list[list[str]] = []
    for name in ("pure_liquids_thermoml", "pure_liquids_thermoml_2"):
        for row in reference(folder, name)[1]:
            key, prop = KEYS.get(row["substance"]), QUANTITIES.get(row["quantity"])
            if key and prop and not row.get("flag") and atmospheric(row):
                rows.append([key, prop, row["T_K"], row["value"], row["reference"]])
    for name in (
        "pure_density_thermoml_2",
        "pure_viscosity_thermoml_295_304K",
        "pure_speed_of_sound_thermoml",
        "pure_static_permittivity_thermoml",
    ):
        rows += wide(reference(folder, name)[1])
    for row in reference(folder, "solvent_mixtures_thermoml")[1]:
        place = {"1": "substance_1", "0": "substance_2"}.get(row["composition_of_substance_1"])
        key, prop = KEYS.get(row[place]) if place else None, QUANTITIES.get(row["quantity"])
        if key and prop:
            value = row["value"] if row["value"][0] != "." else "0" + row["value"]
            rows.append([key, prop, row["T_K"], value, row["reference"]])
    write(
        "ThermoMLArchive",
        [
            "# source: journal papers, DOI (or volume and page) per row",
            "# seen: NIST/TRC ThermoML archive files, and data files of two public repositories",
            "#   that carry rows of that archive; the papers themselves were not seen",
            "# uncertainty: rarely carried; the scatter between papers is the practical measure",
            "# note: 70 to 120 kPa; pure ends of published mixtures included",
        ],
        rows,
    )


def jasper(folder: Path) -> None:
    """The lines of Jasper 1972: the reference table's, then those of chemicals' copy."""
    head, lines = reference(folder, "pure_surface_tension_jasper_1972")
    rows = []
    done = set()
    known = [
        (KEYS.get(row["substance"]), Decimal(row["sigma_at_0C_N_m"]), Decimal(row["dsigma_dT_N_m_K"]),
         float(row["T_min_K"]), float(row["T_max_K"]))
        for row in lines
    ]  # fmt: skip
    copies = table("Interface", "Jasper-Lange.tsv")
    for key, cas in CAS.items():
        row = copies.get(cas)
        if row is not None:
            known.append(
                (key, Decimal(row["a"]) / 1000, -Decimal(row["b"]) / 1000,
                 float(row["Tmin"]), float(row["Tmax"]))
            )  # fmt: skip
    for key, start, slope, low, high in known:
        if key is None or key in done:
            continue
        done.add(key)
        for T in grid(key, low, high):
            value = float(start) + float(slope) * (T - 273.15)
            rows.append([key, "surface_tension", f"{T:.2f}", f"{value:.5f}", ""])
    note = "# note: the straight line of the reprint, evaluated here inside its range"
    write("Jasper1972", [*head[:3], note], rows)


DEGREES = {
    "15": "288.15", "18": "291.15", "19": "292.15", "2": "293.15", "24": "297.15", "25": "298.15",
}  # fmt: skip


def crc(folder: Path) -> None:
    """Spots and equations of the CRC handbook."""
    _, spots = reference(folder, "pure_density_crc")
    rows = wide(spots, "spot")
    known = {row[0] for row in rows}
    constants = table_csv("Misc", "Physical Constants of Organic Compounds.csv")
    refraction = table_csv("Misc", "CRC Handbook Organic RI.csv")
    permittivity = table("Electrolytes", "Permittivity (Dielectric Constant) of Liquids.tsv")
    vaporisation = table("Phase Change", "CRC Handbook Heat of Vaporization.tsv")
    capacity = table(
        "Heat Capacity", "CRC Standard Thermodynamic Properties of Chemical Substances.tsv"
    )
    for key, cas in CAS.items():
        row = constants.get(cas)
        # 0.9420 with the superscript 20 stands as 942.02: four decimals, then the temperature.
        spot = re.fullmatch(r"(\d{3,4}\.\d)(\d{1,2})", row["rho"]) if row and row["rho"] else None
        if spot and key not in known and spot[2] in DEGREES:
            rows.append([key, "density", DEGREES[spot[2]], spot[1], "spot"])
        row = refraction.get(cas)
        if row and row["RI"]:
            T = row["RIT"] or "293.15"
            rows.append([key, "refractive_index", T, row["RI"], "spot"])
        elif cas in constants and constants[cas]["RI"]:
            rows.append([key, "refractive_index", "293.15", constants[cas]["RI"], "spot"])
        row = permittivity.get(cas)
        if row:
            rows.append([key, "static_permittivity", row["T"], row["Permittivity"], "spot"])
            c = numbers(row, "ABCD")
            if row["A"] and row["Tmin"]:
                rows += evaluated(
                    key, "static_permittivity",
                    lambda T, c=c: sum(a * T**n for n, a in enumerate(c)),
                    float(row["Tmin"]), float(row["Tmax"]), 5,
                )  # fmt: skip
        row = vaporisation.get(cas)
        if row and row["Hvap298"]:
            h = float(row["Hvap298"]) / molar_mass(key)
            rows.append([key, "heat_of_vaporisation", "298.15", f"{h:.5g}", "spot"])
        row = capacity.get(cas)
        if row and row["Cpl"]:
            c_p = float(row["Cpl"]) / molar_mass(key)
            rows.append([key, "heat_capacity", "298.15", f"{c_p:.5g}", "spot"])
    head = [
        "# source: CRC Handbook of Chemistry and Physics: tables Physical Constants of Organic "
        "Compounds, Permittivity of Liquids, Enthalpy of Vaporization, Standard Thermodynamic "
        "Properties; editions not all named by the copies",
        CHEMICALS,
        "# uncertainty: not stated in the copies",
        "# note: molar values divided by the molar mass; rows marked spot are printed values",
        EVALUATED,
    ]
    write("CRCHandbook2014", head, rows)


def perry() -> None:
    """The equations of Perry's handbook, 8th edition."""
    rows: list[list[str]] = []
    for key, cas in CAS.items():
        m = molar_mass(key)
        row = table("Density", "Perry Parameters 105.tsv").get(cas)
        if row:
            a, b, c, d = numbers(row, ("C1", "C2", "C3", "C4"))
            # moles per cubic metre
            rows += evaluated(
                key, "density",
                lambda T, a=a, b=b, c=c, d=d, m=m: m * a / b ** (1 + (1 - T / c) ** d),
                float(row["Tmin"]), min(float(row["Tmax"]), c - 1),
            )  # fmt: skip
        row = table("Viscosity", "Table 2-313 Viscosity of Inorganic and Organic Liquids.tsv").get(
            cas
        )
        if row:
            a, b, c, d, e = numbers(row, ("C1", "C2", "C3", "C4", "C5"))
            rows += evaluated(
                key, "viscosity",
                lambda T, a=a, b=b, c=c, d=d, e=e: math.exp(a + b / T + c * math.log(T) + d * T**e),
                float(row["Tmin"]), float(row["Tmax"]),
            )  # fmt: skip
        row = table(
            "Vapor Pressure", "Table 2-8 Vapor Pressure of Inorganic and Organic Liquids.tsv"
        ).get(cas)
        if row:
            a, b, c, d, e = numbers(row, ("C1", "C2", "C3", "C4", "C5"))
            rows += evaluated(
                key, "vapour_pressure",
                lambda T, a=a, b=b, c=c, d=d, e=e: math.exp(a + b / T + c * math.log(T) + d * T**e),
                float(row["Tmin"]), float(row["Tmax"]),
            )  # fmt: skip
        row = table(
            "Phase Change", "Table 2-150 Heats of Vaporization of Inorganic and Organic Liquids.tsv"
        ).get(cas)
        if row:
            a, b, c, d = numbers(row, ("C1", "C2", "C3", "C4"))
            Tc = float(row["Tc"])
            rows += evaluated(
                key, "heat_of_vaporisation",
                lambda T, a=a, b=b, c=c, d=d, Tc=Tc, m=m: (
                    a / m * (1 - T / Tc) ** (b + c * T / Tc + d * (T / Tc) ** 2)
                ),
                float(row["Tmin"]), min(float(row["Tmax"]), Tc - 1), 5,
            )  # fmt: skip
        row = table("Heat Capacity", "Perry_Table_2-153_DIPPR_100.tsv").get(cas)
        if row:
            c = numbers(row, "ABCDE")
            rows += evaluated(
                key, "heat_capacity",
                lambda T, c=c, m=m: sum(a * T**n for n, a in enumerate(c)) / (1000 * m),
                float(row["Tmin"]), float(row["Tmax"]), 5,
            )  # fmt: skip
        row = table(
            "Thermal Conductivity",
            "Table 2-315 Thermal Conductivity of Inorganic and Organic Liquids.tsv",
        ).get(cas)
        if row:
            c = numbers(row, ("C1", "C2", "C3", "C4", "C5"))
            rows += evaluated(
                key, "thermal_conductivity",
                lambda T, c=c: sum(a * T**n for n, a in enumerate(c)),
                float(row["Tmin"]), float(row["Tmax"]), 5,
            )  # fmt: skip
    head = [
        "# source: Perry's Chemical Engineers' Handbook, 8th ed. (2008), tables 2-8, 2-32, 2-150, "
        "2-153, 2-313, 2-315",
        CHEMICALS,
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    write("PerryGreen2008", head, rows)


def vdi(folder: Path) -> None:
    """The PPDS equations and the saturation tables of the VDI Heat Atlas."""
    head, spots = reference(folder, "pure_vdi_heat_atlas_saturation")
    rows = wide(spots, "table")
    for key, cas in CAS.items():
        m = molar_mass(key)
        row = table("Density", "VDI PPDS Density of Saturated Liquids.tsv").get(cas)
        if row:
            Tc, rho = float(row["Tc"]), float(row["rhoc"])
            c = numbers(row, "ABCD")
            rows += evaluated(
                key, "density",
                lambda T, c=c, Tc=Tc, rho=rho: rho + sum(
                    a * (1 - T / Tc) ** n for a, n in zip(c, (0.35, 2 / 3, 1, 4 / 3), strict=True)
                ),
                0.0, Tc - 1,
            )  # fmt: skip
        row = table(
            "Viscosity", "VDI PPDS Dynamic viscosity of saturated liquids polynomials.tsv"
        ).get(cas)
        if row:
            a, b, c_, d, e = numbers(row, "ABCDE")

            def eta(T: float, a: float = a, b: float = b, c: float = c_, d: float = d,
                    e: float = e) -> float:  # fmt: skip
                x = (c - T) / (T - d)
                third = math.copysign(abs(x) ** (1 / 3), x)
                return e * math.exp(third * (a + b * x))

            rows += evaluated(key, "viscosity", eta, 0.0, 413.0)
        row = table("Interface", "VDI PPDS surface tensions.tsv").get(cas)
        if row:
            Tc = float(row["Tc"])
            c = numbers(row, "ABCDE")
            rows += evaluated(
                key, "surface_tension",
                lambda T, c=c, Tc=Tc: c[0] * (1 - T / Tc) ** (
                    c[1] + c[2] * (T / Tc) + c[3] * (T / Tc) ** 2 + c[4] * (T / Tc) ** 3
                ),
                0.0, Tc - 1,
            )  # fmt: skip
        row = table("Phase Change", "VDI PPDS Enthalpies of vaporization.tsv").get(cas)
        if row:
            Tc = float(row["Tc"])
            c = numbers(row, "ABCDE")
            rows += evaluated(
                key, "heat_of_vaporisation",
                lambda T, c=c, Tc=Tc, m=m: R * Tc / m * sum(
                    a * (1 - T / Tc) ** n for a, n in zip(c, (1 / 3, 2 / 3, 1, 2, 6), strict=True)
                ),
                0.0, Tc - 1, 5,
            )  # fmt: skip
        row = table(
            "Vapor Pressure", "VDI PPDS Boiling temperatures at different pressures.tsv"
        ).get(cas)
        if row:
            Tc, pc = float(row["Tc"]), float(row["Pc"])
            c = numbers(row, "ABCD")
            rows += evaluated(
                key, "vapour_pressure",
                lambda T, c=c, Tc=Tc, pc=pc: pc * math.exp(Tc / T * sum(
                    a * (1 - T / Tc) ** n for a, n in zip(c, (1, 1.5, 2.5, 5), strict=True)
                )),
                0.0, Tc - 1,
            )  # fmt: skip
        row = table(
            "Thermal Conductivity", "VDI PPDS Thermal conductivity of saturated liquids.tsv"
        ).get(cas)
        if row:
            c = numbers(row, "ABCDE")
            rows += evaluated(
                key, "thermal_conductivity",
                lambda T, c=c: sum(a * T**n for n, a in enumerate(c)),
                0.0, 413.0, 5,
            )  # fmt: skip
    write(
        "VDIHeatAtlas2010",
        [*head[:3], "# note: VDI Heat Atlas, 2nd ed. (2010), PPDS equations (section D3)",
         CHEMICALS.replace("# seen:", "# note: equations:"), EVALUATED],
        rows,
    )  # fmt: skip


def zabransky() -> None:
    """Heat capacities of the critical review, splines and quasi-polynomials."""
    found = importlib.util.find_spec("chemicals")
    assert found is not None
    assert found.submodule_search_locations
    path = Path(found.submodule_search_locations[0]) / "Heat Capacity" / "Zabransky.tsv"
    parts: dict[str, list[Row]] = {}
    with path.open(encoding="utf-8", newline="") as handle:
        for row in csv.DictReader(handle, delimiter="\t"):
            parts.setdefault(row["CASRN"], []).append(row)
    rows: list[list[str]] = []
    for key, cas in CAS.items():
        mine = parts.get(cas, [])
        kinds = {row["Data Type"] for row in mine}
        # one set of a chemical: along saturation where there is one, else at constant pressure
        kind = next((k for k in ("sat", "C", "p", "avg") if k in kinds), None)
        for row in mine:
            if row["Data Type"] != kind:
                continue
            spline = numbers(row, [f"A{i}-spline" for i in range(1, 5)])
            quasi = numbers(row, [f"A{i}-quasi" for i in range(1, 7)])
            Tc = float(row["Tc"] or 0.0)

            def c_p(T: float, s: list[float] = spline, q: list[float] = quasi, Tc: float = Tc,
                    m: float = molar_mass(key)) -> float:  # fmt: skip
                if any(s):
                    return R / m * sum(a * (T / 100) ** n for n, a in enumerate(s))
                r = T / Tc
                return R / m * (
                    q[0] * math.log(1 - r) + q[1] / (1 - r)
                    + q[2] + q[3] * r + q[4] * r**2 + q[5] * r**3
                )  # fmt: skip

            rows += evaluated(key, "heat_capacity", c_p, float(row["Tmin"]), float(row["Tmax"]), 5)
    head = [
        "# source: Zabransky M., Ruzicka V., Majer V., Domalski E.S., Heat Capacity of Liquids: "
        "Critical Review and Recommended Values, J. Phys. Chem. Ref. Data Monograph 6 (1996), and "
        "its supplement; spline and quasi-polynomial coefficients",
        CHEMICALS,
        "# uncertainty: classes by liquid and range, not carried here",
        EVALUATED,
    ]
    write("Zabransky1996", head, rows)


def surfaces() -> None:
    """Mulero's correlations; and Somayajulu's in its revised coefficients."""
    rows: list[list[str]] = []
    for key, cas in CAS.items():
        row = table("Interface", "MuleroCachadinaParameters.tsv").get(cas)
        if row:
            c = numbers(row, ("sigma0", "n0", "sigma1", "n1", "sigma2", "n2"))
            Tc = float(row["Tc"])
            rows += evaluated(
                key, "surface_tension",
                lambda T, c=c, Tc=Tc: sum(
                    s * (1 - T / Tc) ** n for s, n in zip(c[::2], c[1::2], strict=True)
                ),
                float(row["Tmin"]), min(float(row["Tmax"]), Tc - 1),
            )  # fmt: skip
    head = [
        "# source: Mulero A., Cachadina I., Parra M.I., J. Phys. Chem. Ref. Data 41 (2012) 043105, "
        "doi:10.1063/1.4768782, correlation through the data of many laboratories",
        CHEMICALS,
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    write("Mulero2012", head, rows)


def vapour() -> None:
    """Wagner and Antoine constants of two collections."""
    rows: list[list[str]] = []
    for key, cas in CAS.items():
        row = table("Vapor Pressure", "Wagner Original McGarry.tsv").get(cas)
        if row:
            c = numbers(row, "ABCD")
            Tc, pc = float(row["Tc"]), float(row["Pc"])
            rows += evaluated(
                key, "vapour_pressure",
                lambda T, c=c, Tc=Tc, pc=pc: pc * math.exp(Tc / T * sum(
                    a * (1 - T / Tc) ** n for a, n in zip(c, (1, 1.5, 3, 6), strict=True)
                )),
                float(row["Tmin"]), Tc - 1,
            )  # fmt: skip
    head = [
        "# source: McGarry J., Correlation and Prediction of the Vapor Pressures of Pure Liquids "
        "over Large Pressure Ranges, Ind. Eng. Chem. Process Des. Dev. 22 (1983) 313-322",
        CHEMICALS,
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    write("McGarry1983", head, rows)
    rows = []
    for key, cas in CAS.items():
        row = table("Vapor Pressure", "Antoine Collection Poling.tsv").get(cas)
        if row:
            a, b, c_ = numbers(row, "ABC")
            rows += evaluated(
                key, "vapour_pressure",
                lambda T, a=a, b=b, c=c_: 10.0 ** (a - b / (T + c)),
                float(row["Tmin"]), float(row["Tmax"]), 5,
            )  # fmt: skip
    head = [
        "# source: Poling B.E., Prausnitz J.M., O'Connell J.P., The Properties of Gases and "
        "Liquids, 5th ed. (2001), appendix A, Antoine constants",
        CHEMICALS,
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    write("Poling2001", head, rows)


# Fuller's diffusion volumes of atoms; a ring that is aromatic or heterocyclic counts -18.3
FULLER = {"C": 15.9, "H": 2.31, "O": 6.11, "N": 4.54, "S": 22.9, "Cl": 21.0, "F": 14.7}
RINGS = {
    "benzyl_alcohol": 1, "acetophenone": 1, "tetralin": 1, "benzene": 1, "o-xylene": 1,
    "m-xylene": 1, "p-xylene": 1, "ethylbenzene": 1, "mesitylene": 1, "cumene": 1, "styrene": 1,
    "anisole": 1, "chlorobenzene": 1, "1-2-dichlorobenzene": 1, "nitrobenzene": 1, "pyridine": 1,
    "aniline": 1, "gamma-butyrolactone": 1, "propylene_carbonate": 1, "n-methyl-2-pyrrolidone": 1,
    "2-pyrrolidone": 1, "sulfolane": 1, "tetrahydrofuran": 1, "1-4-dioxane": 1,
}  # fmt: skip


def atoms(formula: str) -> dict[str, int]:
    return {
        element: int(count or 1) for element, count in re.findall(r"([A-Z][a-z]?)(\d*)", formula)
    }


def fuller() -> None:
    """Diffusivity of the vapour in air by Fuller's method, 298.15 K and 101325 Pa."""
    rows = []
    for key, cas in CAS.items():
        counts = atoms(identifiers()[cas][0])
        volume = sum(FULLER[a] * n for a, n in counts.items()) - 18.3 * RINGS.get(key, 0)
        m = 2.0 / (1.0 / 28.96 + 1.0 / (1000 * molar_mass(key)))
        T = 298.15
        value = 0.00143e-4 * T**1.75 / (
            1.01325 * math.sqrt(m) * (volume ** (1 / 3) + 19.7 ** (1 / 3)) ** 2
        )  # fmt: skip
        rows.append([key, "diffusivity_in_air", "298.15", f"{value:.4g}", "equation"])
    head = [
        "# source: method of Fuller, Schettler and Giddings (Ind. Eng. Chem. 58 (1966) 18-27) with "
        "the diffusion volumes of 1969 as printed in Poling et al. 2001, table 11-1",
        "# seen: volumes and equation from memory; they give the 28 values of a reference table of "
        "that method to its four digits",
        "# uncertainty: about 5 % typical, 20 % at worst (the method's own test set, from memory)",
        "# note: 101325 Pa; an estimate, not a measurement",
    ]
    write("Fuller1966", head, rows)


def libraries() -> None:
    """What thermo 0.6.1 fitted itself, to measurements and to a reference program."""
    from thermo import SurfaceTension, ThermalConductivityLiquid, ViscosityLiquid, VolumeLiquid

    classes = {
        "density": VolumeLiquid, "viscosity": ViscosityLiquid,
        "surface_tension": SurfaceTension, "thermal_conductivity": ThermalConductivityLiquid,
    }  # fmt: skip
    fits: list[list[str]] = []
    program: list[list[str]] = []
    tables: list[list[str]] = []
    for key, cas in CAS.items():
        for prop, kind in classes.items():
            known = kind(CASRN=cas)
            for method, rows in (
                ("Fit 2023", fits), ("REFPROP_FIT", program),
                ("VISWANATH_NATARAJAN_3", tables), ("VISWANATH_NATARAJAN_2", tables),
                ("VISWANATH_NATARAJAN_2E", tables),
            ):  # fmt: skip
                if method not in known.all_methods or method not in known.T_limits:
                    continue
                if rows is program and prop not in ("viscosity", "surface_tension"):
                    continue
                if rows is tables and any(row[0] == key for row in tables):
                    continue
                low, high = known.T_limits[method]

                def value(T: float, known: Any = known, method: str = method, prop: str = prop,
                          m: float = molar_mass(key)) -> float:  # fmt: skip
                    got = float(known.calculate(T, method))
                    return m / got if prop == "density" else got

                count = 5 if prop == "thermal_conductivity" else 7
                rows += evaluated(key, prop, value, low, high, count)
    head = [
        "# source: Bell C. and contributors, thermo 0.6.1 (open-source library), correlations "
        "labelled Fit 2023; the measurements behind them are not named there",
        "# seen: evaluated with the library",
        "# uncertainty: not stated",
        EVALUATED,
    ]
    write("BellThermo2023", head, fits)
    head = [
        "# source: Lemmon E.W., Bell I.H., Huber M.L., McLinden M.O., NIST Reference Fluid "
        "Thermodynamic and Transport Properties Database, version 10.0 (2018), as fitted by "
        "thermo 0.6.1 along the saturated liquid",
        "# seen: the fits of the library; the program was not run",
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    write("Lemmon2018", head, program)
    head = [
        "# source: Viswanath D.S., Natarajan G., Data Book on the Viscosity of Liquids (1989), "
        "two- and three-constant equations",
        "# seen: coefficients in the data files of chemicals 1.5.2; the book was not seen; several "
        "rows are known to be corrupt",
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    write("ViswanathNatarajan1989", head, tables)


def others(folder: Path) -> None:
    """Tables of the reference folder that pass through."""
    for name, key in (
        ("pure_surface_tension_adamson_1997", "AdamsonGast1997"),
        ("pure_surface_tension_components_web", "DynePenPage"),
        ("pure_viscosity_vs_temperature_dataset", "Viswanath2007"),
    ):
        head, rows = reference(folder, name)
        write(key, head, wide(rows))
    head, first = reference(folder, "pure_surface_tension_ml_dataset")
    _, second = reference(folder, "pure_surface_tension_ml_dataset_2")
    write("SchmeddingZuend", head, wide([*first, *second]))
    head, rows = reference(folder, "pure_electrical_conductivity_lange")
    found = [
        [KEYS[row["substance"]], "electrical_conductivity", row["T_K"] or "298.15",
         row["electrical_conductivity_S_m"], ""]
        for row in rows
        if row["substance"] in KEYS
    ]  # fmt: skip
    note = "# note: where the copy gives no temperature, 298.15 K stands here"
    write("Lange", [*head, note], found)
    head, rows = reference(folder, "vapour_diffusivity_in_air")
    for book, key in (("Perry", "Perry"), ("Welty", "Welty1984")):
        write(key, head, wide(row for row in rows if row["source_table"] == book))


def main(folder: Path) -> None:
    """Write every file of the organic liquids."""
    archive(folder)
    jasper(folder)
    crc(folder)
    perry()
    vdi(folder)
    zabransky()
    surfaces()
    vapour()
    fuller()
    libraries()
    others(folder)


if __name__ == "__main__":
    main(Path(sys.argv[1]))
