"""Turn reference tables into the long format of `data/published`: solvents, hydrocarbons.

    python data/build/convert_solvents.py FOLDER

FOLDER holds one CSV per source, each with `# source:`, `# seen:`, `# uncertainty:` and `# note:`
lines. Measured values pass through as text, digit for digit. Published equations whose
coefficients were seen are evaluated here on a grid; such files say so in their header.
"""

from __future__ import annotations

import csv
import sys
from collections.abc import Callable, Iterable
from decimal import Decimal
from pathlib import Path
from typing import Any

from compact_points import compact
from solvent_equations import EQUATIONS, hexadecane_rows

PUBLISHED = Path(__file__).resolve().parents[1] / "published"
KEYS = {
    "acetone": "acetone",
    "2-butanone": "2-butanone",
    "ethyl acetate": "ethyl_acetate",
    "toluene": "toluene",
    "heptane": "n-heptane",
    "n-heptane": "n-heptane",
    "dodecane": "n-dodecane",
    "hexadecane": "n-hexadecane",
    "dimethyl sulfoxide": "dimethyl_sulfoxide",
}
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
LIQUID = ["liquid", "property", "T_K", "value", "doi"]
MIXTURE = ["component_1", "component_2", "basis", "fraction_1", "T_K", "property", "value", "doi"]
Row = dict[str, str]


class Table:
    """One reference table: its comment lines and its rows as text."""

    def __init__(self, folder: Path, name: str) -> None:
        lines = (folder / f"{name}.csv").read_text(encoding="utf-8").splitlines()
        self.head = [line for line in lines if line.startswith("#")]
        body = [line for line in lines if line.strip() and not line.startswith("#")]
        self.rows: list[Row] = list(csv.DictReader(body))


def _write(kind: str, key: str, head: Iterable[str], rows: Iterable[list[str]]) -> None:
    path = PUBLISHED / kind / f"{key}.csv"
    path.parent.mkdir(parents=True, exist_ok=True)
    unique = sorted(dict.fromkeys(tuple(row) for row in rows))
    with path.open("w", encoding="utf-8", newline="") as handle:
        for line in dict.fromkeys(head):
            handle.write(f"{line}\n")
        writer = csv.writer(handle, lineterminator="\n")
        writer.writerow(LIQUID if kind == "liquids" else MIXTURE)
        writer.writerows(unique)
    compact(path)


def _wide(table: Table, source: Callable[[Row], str] = lambda row: "") -> list[list[str]]:
    """Rows of our liquids from a table with one column per quantity."""
    found = []
    for row in table.rows:
        liquid = KEYS.get(row.get("substance", row.get("vapour", "")))
        if liquid is None or not row["T_K"]:
            continue
        for column, name in QUANTITIES.items():
            if row.get(column):
                found.append([liquid, name, row["T_K"], row[column], source(row)])
    return found


def _archive(folder: Path) -> None:
    """The rows of the ThermoML archive, in five reference tables."""
    rows: list[list[str]] = []
    for row in Table(folder, "pure_liquids_thermoml").rows:
        liquid, name = KEYS.get(row["substance"]), QUANTITIES.get(row["quantity"])
        if liquid and name:
            rows.append([liquid, name, row["T_K"], row["value"], row["reference"]])
    rows += _wide(Table(folder, "pure_density_thermoml_2"), lambda row: row["doi"])
    rows += _wide(Table(folder, "pure_viscosity_thermoml_295_304K"), lambda row: row["doi"])
    rows += _wide(Table(folder, "pure_speed_of_sound_thermoml"), lambda row: row["reference"])
    for row in Table(folder, "solvent_mixtures_thermoml").rows:
        place = {"1": "substance_1", "0": "substance_2"}.get(row["composition_of_substance_1"])
        liquid, name = KEYS.get(row[place]) if place else None, QUANTITIES.get(row["quantity"])
        if liquid and name:
            value = row["value"] if row["value"][0] != "." else "0" + row["value"]
            rows.append([liquid, name, row["T_K"], value, row["reference"]])
    head = [
        "# source: journal papers, DOI (or volume and page) per row",
        "# seen: NIST/TRC ThermoML archive files, and data files of two public repositories that",
        "#   carry rows of that archive; the papers themselves were not seen",
        "# uncertainty: rarely carried; the scatter between papers is the practical measure",
        "# note: 70 to 120 kPa; pure ends of published mixtures included",
    ]
    _write("liquids", "ThermoMLArchive_solvents", head, rows)


def _jasper(folder: Path) -> None:
    """The lines of Jasper 1972, evaluated every 10 K where both copies hold."""
    table = Table(folder, "pure_surface_tension_jasper_1972")
    rows = []
    for row in table.rows:
        liquid = KEYS.get(row["substance"])
        if liquid is None:
            continue
        start, slope = Decimal(row["sigma_at_0C_N_m"]), Decimal(row["dsigma_dT_N_m_K"])
        low, high = Decimal(row["T_min_K"]), Decimal(row["T_max_K"])
        for step in range(-2, 13):
            T = Decimal("273.15") + 10 * step
            if max(low, Decimal("263.15")) <= T <= min(high, Decimal("393.15")):
                value = start + slope * (T - Decimal("273.15"))
                rows.append([liquid, "surface_tension", str(T), f"{value:.5f}", ""])
    note = "# note: the straight line of the reprint, evaluated here every 10 K inside its range"
    _write("liquids", "Jasper1972_solvents", [*table.head, note], rows)


def _crc(folder: Path) -> None:
    table = Table(folder, "pure_density_crc")
    rows = _wide(table)
    permittivity = Table(folder, "pure_static_permittivity_crc")
    for row in permittivity.rows:
        liquid = KEYS.get(row["substance"])
        if liquid is None:
            continue
        rows.append(
            [liquid, "static_permittivity", row["T_K"], row["relative_permittivity"], "spot"]
        )
        low, high = float(row["T_min_K"]), float(row["T_max_K"])
        c = [float(row[k] or 0) for k in ("a", "b_per_K", "c_per_K2", "d_per_K3")]
        for step in range(7):
            T = low + (high - low) * step / 6
            value = sum(a * T**power for power, a in enumerate(c))
            rows.append([liquid, "static_permittivity", f"{T:.2f}", f"{value:.5g}", "equation"])
    rows += [[*row, ""] for row in EQUATIONS["CRCHandbook2014"].rows]
    head = [*table.head[:3], *permittivity.head[:1], *permittivity.head[2:3]]
    head += EQUATIONS["CRCHandbook2014"].head
    _write("liquids", "CRCHandbook2014_solvents", head, rows)


def _equations(key: str, tables: Iterable[tuple[Table, list[list[str]]]] = ()) -> None:
    """A handbook's equations on a grid, beside what of its tables was seen."""
    head: list[str] = []
    rows: list[list[str]] = []
    for table, found in tables:
        head += table.head
        rows += found
    equations: Any = EQUATIONS[key]
    _write(
        "liquids",
        f"{key}_solvents",
        [*head, *equations.head],
        rows + [[*row, "equation"] for row in equations.rows],
    )


def _mixture(folder: Path) -> None:
    """Dimethyl sulfoxide with water; component 1 is dimethyl sulfoxide."""
    names = ["dimethyl_sulfoxide", "water"]

    def pair(name: str, key: str, column: str, basis: str, other: bool = False) -> None:
        table = Table(folder, name)
        rows = []
        for row in table.rows:
            fraction = row[column]
            if other:
                fraction = str(1 - Decimal(fraction))
            for unit, prop in QUANTITIES.items():
                if row.get(unit):
                    rows.append([*names, basis, fraction, row["T_K"], prop, row[unit], ""])
        _write("mixtures", key, table.head, rows)

    pair("dmso_water_density_jct2006", "JCT2006", "mole_fraction_water", "mole", True)
    pair("dmso_water_jct2007", "JCT2007", "mole_fraction_dmso", "mole")
    pair("dmso_water_viscosity_je9001027", "JCED2009", "mass_fraction_dmso", "mass")
    pair("dmso_water_surface_tension_markarian_2007", "Markarian2007", "mole_fraction_dmso", "mole")
    table = Table(folder, "solvent_mixtures_thermoml")
    rows = [
        [
            *names,
            "mole",
            row["composition_of_substance_1"],
            row["T_K"],
            QUANTITIES[row["quantity"]],
            row["value"],
            row["reference"],
        ]
        for row in table.rows
        if (row["substance_1"], row["substance_2"]) == ("dimethyl sulfoxide", "water")
        and row["composition_type"] == "mole_fraction"
        and row["quantity"] in QUANTITIES
    ]
    _write("mixtures", "ThermoMLArchive_solvents", table.head, rows)


def main(folder: Path) -> None:
    """Write every file of the solvents."""
    _archive(folder)
    _jasper(folder)
    _crc(folder)
    for name, key in (
        ("pure_surface_tension_adamson_1997", "AdamsonGast1997"),
        ("pure_surface_tension_components_web", "DynePenPage"),
        ("pure_surface_tension_ml_dataset", "SchmeddingZuend"),
        ("pure_viscosity_vs_temperature_dataset", "Viswanath2007"),
        ("pure_electrical_conductivity_lange", "Lange"),
        ("vapour_diffusivity_in_air_fuller_298K", "Fuller1966"),
    ):
        table = Table(folder, name)
        rows = _wide(table)
        if name.endswith("lange"):
            rows = [
                [
                    KEYS[row["substance"]],
                    "electrical_conductivity",
                    row["T_K"] or "298.15",
                    row["electrical_conductivity_S_m"],
                    "",
                ]
                for row in table.rows
                if row["substance"] in KEYS
            ]
            table.head.append("# note: where the copy gives no temperature, 298.15 K stands here")
        if key in EQUATIONS:
            rows += [[*row, ""] for row in EQUATIONS[key].rows]
            table.head += EQUATIONS[key].head
        _write("liquids", f"{key}_solvents", table.head, rows)
    diffusivity = Table(folder, "vapour_diffusivity_in_air")
    for book, key in (("Perry", "Perry"), ("Welty", "Welty1984")):
        mine = [row for row in diffusivity.rows if row["source_table"] == book]
        part = Table(folder, "vapour_diffusivity_in_air")
        part.rows = mine
        _write("liquids", f"{key}_solvents", part.head, _wide(part))
    saturation = Table(folder, "pure_vdi_heat_atlas_saturation")
    _equations("VDIHeatAtlas2010", [(saturation, [[*r[:4], "table"] for r in _wide(saturation)])])
    for key in (
        "PerryGreen2008",
        "Zabransky1996",
        "Mulero2012",
        "McGarry1983",
        "Poling2001",
        "BellThermo2023",
        "Gaylord",
    ):
        _equations(key)
    for key, (head, rows) in hexadecane_rows().items():
        _write("liquids", key, head, [[*row, ""] for row in rows])
    _mixture(folder)


if __name__ == "__main__":
    main(Path(sys.argv[1]))
