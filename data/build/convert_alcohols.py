"""Turn reference tables into the long format of `data/published`: alcohols, polyols, aqueous pairs.

    python data/build/convert_alcohols.py FOLDER

FOLDER holds one CSV per source, each with `# source:`, `# seen:`, `# uncertainty:` and `# note:`
lines. Values pass through as text, digit for digit; the only arithmetic is the unit of a
composition (molality to mole fraction, one minus the fraction of the other component).
"""

from __future__ import annotations

import csv
import re
import sys
from collections.abc import Callable, Iterable
from decimal import Decimal
from pathlib import Path

from compact_points import compact

PUBLISHED = Path(__file__).resolve().parents[1] / "published"
KEYS = {
    "glycerol": "glycerol",
    "ethylene glycol": "ethylene_glycol",
    "propylene glycol": "propylene_glycol",
    "methanol": "methanol",
    "ethanol": "ethanol",
    "1-propanol": "1-propanol",
    "2-propanol": "2-propanol",
}
QUANTITIES = {
    "density_kg_m3": "density",
    "viscosity_Pa_s": "viscosity",
    "surface_tension_N_m": "surface_tension",
    "speed_of_sound_m_s": "speed_of_sound",
    "electrical_conductivity_S_m": "electrical_conductivity",
    "vapour_pressure_Pa": "vapour_pressure",
    "refractive_index_nD": "refractive_index",
    "diffusivity_in_air_m2_s": "diffusivity_in_air",
}
Row = dict[str, str]


def _own_words(line: str) -> str:
    """A comment line without what points to other files of the reference folder."""
    if not line.startswith("#"):
        return line
    if "kept elsewhere" in line:
        return "# note: not every row of the printed table is here"
    pointers = (".csv", "README", "correlations.md")
    if not any(word in line for word in pointers):
        return line
    kept = [part for part in re.split(r"(?<=[.;]) ", line) if not any(w in part for w in pointers)]
    text = " ".join(kept).rstrip("; ")
    return text if len(text.split()) > 2 else ""


class Table:
    """One reference table: its comment lines and its rows as text."""

    def __init__(self, folder: Path, name: str) -> None:
        lines = (folder / f"{name}.csv").read_text(encoding="utf-8").splitlines()
        self.head = [
            line for line in map(_own_words, lines) if line.startswith("#") and line.strip("# ")
        ]
        body = [line for line in lines if line.strip() and not line.startswith("#")]
        self.rows: list[Row] = list(csv.DictReader(body))


def _write(path: Path, head: Iterable[str], columns: list[str], rows: list[list[str]]) -> None:
    path.parent.mkdir(parents=True, exist_ok=True)
    unique = list(dict.fromkeys(tuple(row) for row in rows))
    with path.open("w", encoding="utf-8", newline="") as handle:
        for line in dict.fromkeys(head):
            handle.write(f"{line}\n")
        writer = csv.writer(handle, lineterminator="\n")
        writer.writerow(columns)
        writer.writerows(unique)
    compact(path)


def pure(key: str, head: Iterable[str], rows: list[list[str]]) -> None:
    """Write a file of pure liquids: liquid, property, T_K, value, doi."""
    columns = ["liquid", "property", "T_K", "value", "doi"]
    _write(PUBLISHED / "liquids" / f"{key}.csv", head, columns, rows)


def mixture(key: str, head: Iterable[str], rows: list[list[str]]) -> None:
    """Write a file of pairs, in the columns of the record format."""
    columns = [
        "component_1",
        "component_2",
        "basis",
        "fraction_1",
        "T_K",
        "property",
        "value",
        "doi",
    ]
    _write(PUBLISHED / "mixtures" / f"{key}.csv", head, columns, rows)


def _one_minus(text: str) -> str:
    return str(1 - Decimal(text))


def only(column: str, name: str) -> Callable[[Row], bool]:
    """A filter for the rows that name one substance in a column."""
    return lambda row: row[column] == name


def pair_rows(
    table: Table,
    components: tuple[str, str],
    basis: str,
    column: str,
    *,
    other: bool = False,
    keep: Callable[[Row], bool] = lambda row: True,
) -> list[list[str]]:
    """Rows of a pair; `other` = the column gives the fraction of component 2."""
    found = []
    for row in table.rows:
        if not keep(row) or not row.get("T_K"):
            continue
        fraction = _one_minus(row[column]) if other else row[column]
        if Decimal(fraction) in (0, 1):
            continue
        for quantity, prop in QUANTITIES.items():
            if row.get(quantity):
                doi = row.get("doi", "")
                found.append([*components, basis, fraction, row["T_K"], prop, row[quantity], doi])
    return found


def end_rows(table: Table, liquid: str, column: str, at: int) -> list[list[str]]:
    """The pure end of a mixture table, where the fraction in `column` equals `at`."""
    return [
        [liquid, prop, row["T_K"], row[quantity], row.get("doi", "")]
        for row in table.rows
        if row.get("T_K") and Decimal(row[column]) == at
        for quantity, prop in QUANTITIES.items()
        if row.get(quantity)
    ]


def archive(folder: Path) -> None:
    """The NIST/TRC archive rows of pure alcohols and polyols."""
    head = [
        "# source: journal papers, DOI (or volume and page) per row",
        "# seen: NIST/TRC ThermoML archive files, and data files of two public repositories that",
        "#   carry rows of that archive; the papers themselves were not seen",
        "# uncertainty: rarely carried; the scatter between papers is the practical measure",
        "# note: 70 to 120 kPa",
    ]
    rows = []
    for name in (
        "pure_liquids_thermoml",
        "pure_density_thermoml_2",
        "pure_viscosity_thermoml_295_304K",
        "pure_speed_of_sound_thermoml",
    ):
        for row in Table(folder, name).rows:
            if row["substance"] not in KEYS:
                continue
            doi = row.get("doi") or row.get("reference") or ""
            # One paper was printed in two issues of the journal; it counts once.
            if doi == "Int. J. Thermophys. 29 (2008) 1376-1384":
                continue
            quantity = row.get("quantity")
            if quantity:
                value = row["value"]
            else:
                quantity = next(q for q in QUANTITIES if row.get(q))
                value = row[quantity]
            rows.append([KEYS[row["substance"]], QUANTITIES[quantity], row["T_K"], value, doi])
    rows.sort(key=lambda r: (r[0], r[1], float(r[2]), r[4]))
    pure("ThermoMLArchive_alcohols", head, rows)


def pure_tables(folder: Path) -> None:
    """Single-source tables of pure liquids."""

    def simple(key: str, *names: str) -> None:
        head, rows = [], []
        for name in names:
            table = Table(folder, name)
            head += table.head
            for row in table.rows:
                liquid = KEYS.get(row.get("substance") or row.get("vapour") or "")
                if liquid is None or not row.get("T_K"):
                    continue
                if row.get("source_table") not in (None, key.rstrip("0123456789")):
                    continue
                for quantity, prop in QUANTITIES.items():
                    if row.get(quantity):
                        rows.append([liquid, prop, row["T_K"], row[quantity], ""])
        pure(f"{key}_alcohols", head, rows)

    simple("VDIHeatAtlas2010", "pure_vdi_heat_atlas_saturation")
    simple("AdamsonGast1997", "pure_surface_tension_adamson_1997")
    simple("Lange", "pure_electrical_conductivity_lange")
    simple("Viswanath2007", "pure_viscosity_vs_temperature_dataset")
    simple("Welty1984", "vapour_diffusivity_in_air")
    simple("Perry", "vapour_diffusivity_in_air")
    simple("Fuller1966", "vapour_diffusivity_in_air_fuller_298K")

    for key, name, liquid, column, at in (
        ("SegurOberstar1951", "glycerol_water_viscosity_segur_oberstar_1951",
         "glycerol", "mass_fraction_glycerol", 1),
        ("BosartSnoddy1927", "glycerol_water_density_bosart_snoddy_1927",
         "glycerol", "mass_fraction_glycerol", 1),
        ("Vazquez1995", "methanol_water_surface_tension_vazquez_1995",
         "methanol", "mass_fraction_methanol", 1),
        ("Yang2003", "ethylene_glycol_water_viscosity_yang_2003",
         "ethylene_glycol", "mole_fraction_ethylene_glycol", 1),
        ("SunTeja2004", "propylene_glycol_water_sun_teja_2004",
         "propylene_glycol", "mole_fraction_propylene_glycol", 1),
        ("GeorgeSastry2003", "propylene_glycol_water_george_sastry_2003",
         "propylene_glycol", "mole_fraction_water", 0),
        ("Tanaka1988", "propylene_glycol_water_viscosity_tanaka_1988",
         "propylene_glycol", "mass_fraction_propylene_glycol", 1),
        ("Nakanishi1967", "propylene_glycol_water_density_nakanishi_1967",
         "propylene_glycol", "mass_fraction_propylene_glycol", 1),
        ("MacBeth1951", "propylene_glycol_water_macbeth_1951",
         "propylene_glycol", "mass_fraction_propylene_glycol", 1),
        ("OIMLR22", "ethanol_water_density_oiml_r22", "ethanol", "mass_fraction_ethanol", 1),
    ):  # fmt: skip
        table = Table(folder, name)
        pure(key, table.head, end_rows(table, liquid, column, at))
    head, rows = [], []
    for name, liquid, column, at in (
        ("ethanol_water_viscosity_gonzalez_2007", "ethanol", "mole_fraction_water", 0),
        ("methanol_water_gonzalez_2007", "methanol", "mole_fraction_water", 0),
    ):
        table = Table(folder, name)
        head += table.head
        rows += end_rows(table, liquid, column, at)
    pure("Gonzalez2007", head, rows)
    head, rows = [], []
    for name, liquid in (
        ("1-propanol_water_viscosity_gonzalez_2008", "1-propanol"),
        ("2-propanol_water_gonzalez_2008", "2-propanol"),
    ):
        table = Table(folder, name)
        head += table.head
        rows += end_rows(table, liquid, f"mole_fraction_{liquid}", 1)
    pure("Gonzalez2008", head, rows)


def pairs(folder: Path) -> None:
    """The aqueous pairs."""
    glycerol, ethanol, methanol = (
        ("glycerol", "water"),
        ("ethanol", "water"),
        ("methanol", "water"),
    )
    isopropanol, salt = ("2-propanol", "water"), ("sodium_chloride", "water")

    def single(key: str, name: str, pair: tuple[str, str], basis: str, column: str) -> None:
        table = Table(folder, name)
        mixture(key, table.head, pair_rows(table, pair, basis, column))

    def several(key: str, parts: list[tuple[str, tuple[str, str], str, str, bool]]) -> None:
        head, rows = [], []
        for name, pair, basis, column, other in parts:
            table = Table(folder, name)
            head += table.head
            rows += pair_rows(table, pair, basis, column, other=other)
        mixture(key, head, rows)

    single("SegurOberstar1951", "glycerol_water_viscosity_segur_oberstar_1951",
           glycerol, "mass", "mass_fraction_glycerol")  # fmt: skip
    single("BosartSnoddy1927", "glycerol_water_density_bosart_snoddy_1927",
           glycerol, "mass", "mass_fraction_glycerol")  # fmt: skip
    single("Egorov2013", "glycerol_water_density_egorov_2013",
           glycerol, "mole", "composition_of_glycerol")  # fmt: skip
    single("GerkeLab", "glycerol_water_gerke_lab", glycerol, "mass", "mass_fraction_glycerol")
    several("GPA1963", [
        ("glycerol_water_refractive_index_gpa_1963", glycerol, "mass",
         "mass_fraction_glycerol", False),
        ("glycerol_water_surface_tension_gpa_1963", glycerol, "mass",
         "mass_fraction_glycerol", False),
    ])  # fmt: skip
    single("Takamura2012", "glycerol_water_surface_tension_takamura_2012",
           glycerol, "mass", "mass_fraction_glycerol")  # fmt: skip
    several("Melinder2010", [
        ("glycerol_water_melinder_2010", glycerol, "mass", "mass_fraction_glycerol", False),
        ("ethanol_water_melinder_2010", ethanol, "mass", "mass_fraction_ethanol", False),
        ("methanol_water_melinder_2010", methanol, "mass", "mass_fraction_methanol", False),
        ("sodium_chloride_water_melinder_2010", salt, "mass", "mass_fraction_NaCl", False),
    ])  # fmt: skip
    several("VDIHeatAtlas2010", [
        ("methanol_water_vdi", methanol, "mass", "mass_fraction_methanol", False),
        ("sodium_chloride_water_vdi", salt, "mass", "mass_fraction_NaCl", False),
    ])  # fmt: skip
    several("Gonzalez2007", [
        ("ethanol_water_viscosity_gonzalez_2007", ethanol, "mole", "mole_fraction_water", True),
        ("methanol_water_gonzalez_2007", methanol, "mole", "mole_fraction_water", True),
    ])  # fmt: skip
    single("Gonzalez2008", "2-propanol_water_gonzalez_2008",
           isopropanol, "mole", "mole_fraction_2-propanol")  # fmt: skip
    single("Zarei2008", "2-propanol_water_density_zarei_2008",
           isopropanol, "mole", "mole_fraction_2-propanol")  # fmt: skip
    single("OIMLR22", "ethanol_water_density_oiml_r22", ethanol, "mass", "mass_fraction_ethanol")
    single("JCT2018", "ethanol_water_viscosity_jct2018", ethanol, "mole", "mole_fraction_ethanol")
    single("Pecar2005", "ethanol_water_density_fpe2005", ethanol, "mole", "mole_fraction_ethanol")
    single("Vazquez1995", "methanol_water_surface_tension_vazquez_1995",
           methanol, "mass", "mass_fraction_methanol")  # fmt: skip
    single("FPE2018", "sodium_chloride_water_density_fpe2018", salt, "mole", "mole_fraction_NaCl")
    spots = Table(folder, "alcohol_water_293K_crc_spots")
    rows = []
    for alcohol in ("ethanol", "methanol"):
        rows += pair_rows(spots, (alcohol, "water"), "mass", "mass_fraction_alcohol",
                          keep=only("alcohol", alcohol))  # fmt: skip
    mixture("CRCHandbook2016", spots.head, rows)
    recalled = Table(folder, "FROM_MEMORY_alcohol_water_surface_tension_vazquez_1995")
    rows = []
    for alcohol in ("2-propanol", "ethanol"):
        rows += pair_rows(recalled, (alcohol, "water"), "mass", "mass_fraction_alcohol",
                          keep=only("alcohol", alcohol))  # fmt: skip
    mixture("Vazquez1995recalled", recalled.head, rows)

    aqueous = Table(folder, "aqueous_mixtures_density_thermoml")
    rows = []
    for alcohol in ("2-propanol", "ethanol", "glycerol"):
        rows += pair_rows(aqueous, (alcohol, "water"), "mole", "mole_fraction_substance_1",
                          keep=only("substance_1", alcohol))  # fmt: skip
    mixture("ThermoMLArchive_alcohols", aqueous.head, rows)

    # Salt: molality becomes a mole fraction (water 0.018015268 kg/mol).
    head, rows = [], []
    for name in (
        "sodium_chloride_water_density_thermoml",
        "sodium_chloride_water_viscosity_thermoml",
    ):
        table = Table(folder, name)
        head += table.head
        for row in table.rows:
            amount, basis = row["composition_of_NaCl"], "mass"
            if row["composition_type"] == "molality":
                m = Decimal(amount)
                amount = f"{m / (m + 1 / Decimal('0.018015268')):.8f}"
                basis = "mole"
            for quantity, prop in QUANTITIES.items():
                if row.get(quantity):
                    rows.append([*salt, basis, amount, row["T_K"], prop, row[quantity], row["doi"]])
    mixture("ThermoMLArchive_sodium_chloride", head, rows)
    table = Table(folder, "alkali_chloride_water_surface_tension")
    mixture("AlkaliChlorideTables", table.head,
            pair_rows(table, salt, "mass", "mass_fraction_salt",
                      keep=only("salt", "NaCl")))  # fmt: skip


if __name__ == "__main__":
    source = Path(sys.argv[1])
    archive(source)
    pure_tables(source)
    pairs(source)
