"""Turn reference tables of binary mixtures into the long format of `data/published`.

    python data/build/convert_pairs.py FOLDER

FOLDER holds one CSV per source, with `# source:`, `# seen:`, `# uncertainty:` and `# note:` lines.
Values pass through as text, digit for digit; a fraction of the other component becomes 1 - x.
"""

from __future__ import annotations

import csv
import sys
from collections.abc import Iterable, Mapping, Sequence
from decimal import Decimal
from pathlib import Path
from typing import TypedDict

from compact_points import compact
from convert_organics import KEYS, PUBLISHED, QUANTITIES, reference

MIXTURE = ["component_1", "component_2", "basis", "fraction_1", "T_K", "property", "value", "doi"]
PROPERTIES = QUANTITIES | {"refractive_index_nD": "refractive_index"}
# Liquids whose records rest on other files.
KNOWN = KEYS | {
    "acetone": "acetone", "2-butanone": "2-butanone", "ethyl acetate": "ethyl_acetate",
    "toluene": "toluene", "heptane": "n-heptane", "dodecane": "n-dodecane",
    "hexadecane": "n-hexadecane", "dimethyl sulfoxide": "dimethyl_sulfoxide",
    "methanol": "methanol", "ethanol": "ethanol", "1-propanol": "1-propanol",
    "2-propanol": "2-propanol", "ethylene glycol": "ethylene_glycol",
    "propylene glycol": "propylene_glycol", "glycerol": "glycerol", "water": "water",
    "squalane": "squalane",
}  # fmt: skip
DONE = {("dimethyl_sulfoxide", "water"), ("ethanol", "water"), ("glycerol", "water"),
        ("methanol", "water"), ("2-propanol", "water")}  # fmt: skip


NO_DOIS: Mapping[str, str] = {}


class Options(TypedDict, total=False):
    """What a table needs said beside its columns."""

    of_second: bool
    skip: Sequence[str]
    dois: Mapping[str, str]


def oriented(
    first: str, second: str, basis: str, fraction: str, T: str, prop: str, value: str, doi: str
) -> list[str]:
    """A row with its components in alphabetical order."""
    if first > second:
        first, second = second, first
        fraction = str(1 - Decimal(fraction))
    value = value if value[0] != "." else "0" + value
    return [first, second, basis, fraction, T, prop, value, doi]


def write(source: str, head: Iterable[str], rows: Iterable[Sequence[str]]) -> None:
    unique = sorted(dict.fromkeys(tuple(row) for row in rows))
    if not unique:
        return
    path = PUBLISHED / "mixtures" / f"{source}.csv"
    with path.open("w", encoding="utf-8", newline="") as handle:
        handle.writelines(f"{line}\n" for line in dict.fromkeys(head))
        writer = csv.writer(handle, lineterminator="\n")
        writer.writerow(MIXTURE)
        writer.writerows(unique)
    compact(path)


def archive(folder: Path) -> None:
    """The binary mixtures of the ThermoML archive; their pure ends stand with the liquids."""
    rows = []
    seen: dict[str, list[str]] = {}
    for name in (
        "solvent_mixtures_thermoml",
        "solvent_mixtures_density_thermoml_2",
        "aqueous_mixtures_density_thermoml",
    ):
        head, table = reference(folder, name)
        seen[name] = head
        for row in table:
            first, second = KNOWN.get(row["substance_1"]), KNOWN.get(row["substance_2"])
            if first is None or second is None or row.get("flag"):
                continue
            if (min(first, second), max(first, second)) in DONE:
                continue
            fraction = row.get("composition_of_substance_1") or row["mole_fraction_substance_1"]
            basis = row.get("composition_type", "mole_fraction").removesuffix("_fraction")
            if float(fraction) in (0.0, 1.0) or basis not in ("mole", "mass"):
                continue
            doi = row.get("reference") or row.get("doi") or ""
            quantity = row.get("quantity", "density_kg_m3")
            value = row.get("value") or row.get("density_kg_m3") or ""
            prop = PROPERTIES.get(quantity)
            # No rule mixes speeds of sound or permittivities.
            if prop in ("density", "viscosity", "surface_tension", "refractive_index"):
                rows.append(oriented(first, second, basis, fraction, row["T_K"], prop, value, doi))
    head = [
        "# source: journal papers, DOI (or volume and page) per row",
        "# seen: NIST/TRC ThermoML archive files, and data files of public repositories that carry",
        "#   rows of that archive; the papers themselves were not seen",
        "# uncertainty: rarely carried; the scatter between papers is the practical measure",
        "# note: about 101 kPa; pure ends stand with the liquids",
    ]
    write("ThermoMLArchive_organics", head, rows)


def single(
    folder: Path, name: str, source: str, first: str, second: str, column: str, *,
    of_second: bool = False, skip: Sequence[str] = (), dois: Mapping[str, str] = NO_DOIS,
) -> tuple[str, list[str], list[list[str]]]:  # fmt: skip
    """One table of one pair."""
    head, table = reference(folder, name)
    rows = []
    for row in table:
        basis = column.split("_")[0].replace("composition", "mole")
        fraction = row[column]
        if row.get("composition_type", "mole_fraction") != "mole_fraction":
            if row["composition_type"] != "mass_fraction":
                continue
            basis = "mass"
        if of_second:
            fraction = str(1 - Decimal(fraction))
        if float(fraction) in (0.0, 1.0) or row.get("flag"):
            continue
        for unit, prop in PROPERTIES.items():
            if row.get(unit) and prop not in skip:
                T = row.get("T_K") or "298.15"
                rows.append(
                    oriented(first, second, basis, fraction, T, prop,
                             row[unit], row.get("doi") or dois.get(prop, ""))
                )  # fmt: skip
    return source, head, rows


# name, source, first, second, column[, options]: column is the first component's fraction
TABLES: tuple[tuple[str, str, str, str, str, Options], ...] = (
    ("acetone_water_density", "ThermoMLArchive_aqueous", "acetone", "water",
     "mole_fraction_acetone", {}),
    ("acetonitrile_water_298K_ansari_2022", "Ansari2022", "acetonitrile", "water",
     "mass_fraction_acetonitrile", {}),
    ("dmf_water_298K", "ThermoMLArchive_aqueous", "dimethylformamide", "water", "mole_fraction_dmf",
     {"dois": {"viscosity": "10.1021/je050209y", "density": "10.1016/j.jct.2007.05.015"}}),
    ("ethylene_glycol_water_melinder_2010", "Melinder2010_glycols", "ethylene_glycol", "water",
     "mass_fraction_ethylene_glycol", {}),
    ("ethylene_glycol_water_viscosity_jct2006", "JCT2006glycol", "ethylene_glycol", "water",
     "mass_fraction_ethylene_glycol", {}),
    ("ethylene_glycol_water_viscosity_other_thermoml", "ThermoMLArchive_aqueous",
     "ethylene_glycol", "water", "mole_fraction_ethylene_glycol", {}),
    ("ethylene_glycol_water_viscosity_sun_teja_2003", "SunTeja2003", "ethylene_glycol", "water",
     "mole_fraction_ethylene_glycol", {}),
    ("ethylene_glycol_water_viscosity_yang_2003", "Yang2003", "ethylene_glycol", "water",
     "mole_fraction_ethylene_glycol", {}),
    ("propane-1-3-diol_water_density_2016", "ThermoMLArchive_aqueous", "1-3-propanediol", "water",
     "composition_of_propane-1-3-diol", {}),
    ("propylene_glycol_water_density_nakanishi_1967", "Nakanishi1967", "propylene_glycol", "water",
     "mass_fraction_propylene_glycol", {}),
    ("propylene_glycol_water_george_sastry_2003", "GeorgeSastry2003", "propylene_glycol", "water",
     "mole_fraction_water", {"of_second": True}),
    ("propylene_glycol_water_khattab_2017", "Khattab2017", "propylene_glycol", "water",
     "mole_fraction_propylene_glycol", {"skip": ("viscosity",)}),
    ("propylene_glycol_water_macbeth_1951", "MacBeth1951", "propylene_glycol", "water",
     "mass_fraction_propylene_glycol", {}),
    ("propylene_glycol_water_melinder_2010", "Melinder2010_glycols", "propylene_glycol", "water",
     "mass_fraction_propylene_glycol", {}),
    ("propylene_glycol_water_sun_teja_2004", "SunTeja2004", "propylene_glycol", "water",
     "mole_fraction_propylene_glycol", {}),
    ("propylene_glycol_water_viscosity_tanaka_1988", "Tanaka1988", "propylene_glycol", "water",
     "mass_fraction_propylene_glycol", {}),
    ("1-propanol_water_viscosity_gonzalez_2008", "Gonzalez2008_1-propanol", "1-propanol", "water",
     "mole_fraction_1-propanol", {}),
    ("acetonitrile_methanol_surface_tension_2006", "ThermoMLArchive_surfaces", "acetonitrile",
     "methanol", "mole_fraction_acetonitrile",
     {"dois": {"surface_tension": "10.1021/je050519g"}}),
    ("hexane_ethanol_surface_tension_jimenez_2000", "Jimenez2000", "n-hexane", "ethanol",
     "mole_fraction_hexane", {}),
)  # fmt: skip


def main(folder: Path) -> None:
    """Write every file of the pairs."""
    archive(folder)
    files: dict[str, tuple[list[str], list[list[str]]]] = {}
    for name, source, first, second, column, options in TABLES:
        _, head, rows = single(folder, name, source, first, second, column, **options)
        heads, found = files.setdefault(source, ([], []))
        heads += head
        found += rows
    head, table = reference(folder, "1-2-hexanediol_water_surface_tension")
    both = (("pendant", "surface_tension_pendant_N_m"), ("ring", "surface_tension_ring_N_m"))
    rows = [
        oriented("1-2-hexanediol", "water", "mass", row["mass_fraction_1_2_hexanediol"], "298.15",
                 "surface_tension", row[column], how)
        for row in table
        for how, column in both
        if row[column] and float(row["mass_fraction_1_2_hexanediol"]) not in (0.0, 1.0)
    ]  # fmt: skip
    files["HexanediolTables"] = (head, rows)
    head, table = reference(folder, "alcohol_water_293K_crc_spots")
    rows = []
    for row in table:
        key = KNOWN.get(row["alcohol"])
        for unit, prop in PROPERTIES.items():
            if key and (min(key, "water"), max(key, "water")) not in DONE and row.get(unit):
                rows.append(
                    oriented(key, "water", "mass", row["mass_fraction_alcohol"], row["T_K"], prop,
                             row[unit], "spot")
                )  # fmt: skip
    files["CRCHandbook2016_alcohols"] = (head, rows)
    for source, (heads, rows) in files.items():
        write(source, heads, rows)


if __name__ == "__main__":
    main(Path(sys.argv[1]))
