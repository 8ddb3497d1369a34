"""Turn reference tables into the long format of `data/published`: water and mercury.

    python data/build/convert_water.py FOLDER

FOLDER holds one CSV per source, each with `# source:`, `# seen:`, `# uncertainty:` and `# note:`
lines. Values pass through as text, digit for digit. Tables that were read elsewhere stand in
`data/published` directly, with the place in their own `# seen:` line.
"""

from __future__ import annotations

import csv
import sys
from collections.abc import Callable, Iterable
from pathlib import Path

from compact_points import compact

PUBLISHED = Path(__file__).resolve().parents[1] / "published" / "liquids"
QUANTITIES = {
    "density_kg_m3": "density",
    "viscosity_Pa_s": "viscosity",
    "surface_tension_N_m": "surface_tension",
    "relative_permittivity": "static_permittivity",
    "electrical_conductivity_S_m": "electrical_conductivity",
    "diffusivity_in_air_m2_s": "diffusivity_in_air",
    "vapour_pressure_Pa": "vapour_pressure",
    "speed_of_sound_m_s": "speed_of_sound",
}
Row = dict[str, str]


def read(path: Path) -> tuple[list[str], list[Row]]:
    """Header comments and rows of a reference file."""
    lines = path.read_text(encoding="utf-8").splitlines()
    comments = [line for line in lines if line.startswith("#")]
    return comments, list(csv.DictReader(line for line in lines if not line.startswith("#")))


def write(name: str, comments: Iterable[str], rows: Iterable[tuple[str, ...]]) -> None:
    """One long-format file of pure liquids."""
    path = PUBLISHED / f"{name}.csv"
    with path.open("w", encoding="utf-8", newline="") as handle:
        handle.writelines(f"{line}\n" for line in comments)
        writer = csv.writer(handle, lineterminator="\n")
        writer.writerow(["liquid", "property", "T_K", "value", "doi"])
        writer.writerows(rows)
    compact(path)


def wide(name: str, source: Path, liquid: str, chosen: Callable[[Row], bool]) -> None:
    """One column per property becomes one row per value; empty cells are passed over."""
    comments, rows = read(source)
    found = [
        (liquid, QUANTITIES[column], row["T_K"], row[column], "")
        for row in rows
        if chosen(row)
        for column in row
        if column in QUANTITIES and row[column]
    ]
    write(name, comments, found)


def archive(name: str, source: Path, liquid: str) -> None:
    """The archive's file has one quantity per row and a reference that counts as a source."""
    comments, rows = read(source)
    wanted = ("density", "viscosity", "surface_tension")
    found = [
        (liquid, QUANTITIES[row["quantity"]], row["T_K"], row["value"], row["reference"])
        for row in rows
        if row["substance"] == liquid and QUANTITIES.get(row["quantity"]) in wanted
    ]
    write(name, comments, found)


def main(folder: Path) -> None:
    """All files of water and mercury that come from the reference folder."""

    def named(liquid: str) -> Callable[[Row], bool]:
        return lambda row: row.get("substance", row.get("vapour")) == liquid

    def everything(row: Row) -> bool:
        return True

    archive("ThermoMLArchive_water", folder / "pure_liquids_thermoml.csv", "water")
    adamson = folder / "pure_surface_tension_adamson_1997.csv"
    wide("AdamsonGast1997_water", adamson, "water", named("water"))
    wide("AdamsonGast1997_mercury", adamson, "mercury", named("mercury"))
    wide("IAPWSTables_water", folder / "water_iapws.csv", "water", everything)
    wide("WaterDataPage", folder / "water_static_permittivity.csv", "water", everything)
    lange = folder / "pure_electrical_conductivity_lange.csv"
    wide("Lange_water", lange, "water", named("water"))
    wide("Lange_mercury", lange, "mercury", named("mercury"))
    diffusivity = folder / "vapour_diffusivity_in_air.csv"
    wide("Welty1984_water", diffusivity, "water", named("water"))
    vdi = folder / "mercury_vdi_heat_atlas.csv"
    wide("VDIHeatAtlas2010_mercury", vdi, "mercury", everything)
    comments, rows = read(folder / "pure_vapour_pressure_several_correlations.csv")
    pressures = [
        ("water", "vapour_pressure", row["T_K"], row["vapour_pressure_perry_Pa"], "")
        for row in rows
        if row["substance"] == "water"
    ]
    write("Perry2008_water", comments, pressures)


if __name__ == "__main__":
    main(Path(sys.argv[1]))
