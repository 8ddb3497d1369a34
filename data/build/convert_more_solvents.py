"""Further equations for solvents that lacked a second source, into `data/published/liquids`.

    python data/build/convert_more_solvents.py

From data files of chemicals 1.5.2: the equations of ChemSep's component file (left out: those that
are Perry's to 0.01 %, as for xylenes and acetonitrile, and those that two other sources
contradict); Antoine and Wagner constants of three collections, evaluated through thermo 0.6.1; and
one saturation table of the VDI Heat Atlas.
"""

from __future__ import annotations

import csv
import json
import math
import tomllib
import warnings
import xml.etree.ElementTree as ET
from collections.abc import Iterable
from pathlib import Path

import chemicals
from compact_points import compact

DATA = Path(__file__).resolve().parent.parent
MISC = Path(chemicals.__file__).parent / "Misc"
COPY = (
    "# seen: coefficients or values in the data files of the open-source library chemicals 1.5.2; "
    "the work itself was not seen"
)
EVALUATED = "# note: rows marked equation are evaluations of the printed equation, made here"
TAGS = {
    "density": "LiquidDensity",
    "viscosity": "LiquidViscosity",
    "surface_tension": "SurfaceTension",
    "vapour_pressure": "VaporPressure",
}
# key: property: temperatures [K]
ALL = (253.15, 273.15, 298.15, 323.15, 353.15, 383.15, 413.15)
WARM = (273.15, 298.15, 323.15, 353.15, 383.15, 413.15)
MELTS_ABOVE_273 = (283.15, 298.15, 323.15, 353.15, 383.15, 413.15)
WANTED: dict[str, dict[str, tuple[float, ...]]] = {
    "n-undecane": {"density": ALL},
    "n-tridecane": {"density": WARM, "viscosity": WARM, "vapour_pressure": WARM},
    "n-tetradecane": {"vapour_pressure": MELTS_ABOVE_273},
    "n-pentadecane": {"density": MELTS_ABOVE_273, "vapour_pressure": MELTS_ABOVE_273},
    "methylcyclohexane": {"density": ALL},
    "cis-decalin": {"density": ALL, "viscosity": ALL},
    "trans-decalin": {"density": ALL, "viscosity": ALL, "vapour_pressure": ALL},
    "mesitylene": {"density": ALL, "viscosity": ALL},
    "styrene": {"surface_tension": (273.15, 298.15, 323.15)},
    "anisole": {p: ALL for p in TAGS},
    "carbon_tetrachloride": {"density": ALL},
    "1-2-dichloroethane": {"density": ALL},
    "trichloroethylene": {"density": ALL, "viscosity": ALL, "surface_tension": ALL},
    "1-2-dichlorobenzene": {
        "density": WARM, "viscosity": WARM, "surface_tension": WARM, "vapour_pressure": WARM,
    },
    "dimethylformamide": {"surface_tension": ALL, "vapour_pressure": ALL},
    "dimethylacetamide": {p: ALL for p in TAGS},
    "nitrobenzene": {"viscosity": MELTS_ABOVE_273, "vapour_pressure": MELTS_ABOVE_273},
    "sulfolane": {"density": (303.15, 323.15, 353.15, 383.15, 413.15)},
    "tetrahydrofuran": {"surface_tension": ALL},
    "diethyl_ether": {"density": ALL},
    "dibutyl_ether": {"viscosity": ALL},
    "methyl_tert-butyl_ether": {"surface_tension": ALL, "vapour_pressure": ALL},
    "propionic_acid": {"density": ALL},
}  # fmt: skip


def value(node: ET.Element, T: float) -> float:
    """The equation of one property at a temperature, in the file's units."""
    text = {child.tag: child.get("value") or "0" for child in node}
    a, b, c, d, e = (float(text.get(letter, "0")) for letter in "ABCDE")
    match text["eqno"]:
        case "10":
            return math.exp(a - b / (T + c))
        case "16":
            return a + math.exp(b / T + c + d * T + e * T * T)
        case "101":
            return math.exp(a + b / T + c * math.log(T) + d * T**e)
        case "105":
            return float(a / b ** (1.0 + (1.0 - T / c) ** d))
        case other:
            raise ValueError(f"equation {other} of ChemSep is not read here")


def cas(key: str) -> str:
    """The CAS number of a liquid, from its spec."""
    spec = tomllib.loads((DATA / f"build/specs/liquids/{key}.toml").read_text("utf-8"))
    return str(spec["cas"])


def write(name: str, head: Iterable[str], rows: Iterable[list[str]]) -> None:
    """One file of points."""
    path = DATA / f"published/liquids/{name}.csv"
    with path.open("w", encoding="utf-8", newline="") as handle:
        handle.writelines(f"{line}\n" for line in head)
        writer = csv.writer(handle, lineterminator="\n")
        writer.writerow(["liquid", "property", "T_K", "value", "doi"])
        writer.writerows(rows)
    compact(path)


def chemsep() -> None:
    """ChemSep's equations."""
    found = {
        node.get("value"): compound
        for compound in ET.parse(MISC / "ChemSep8.32.xml").getroot().iter("compound")
        if (node := compound.find("CAS")) is not None
    }
    rows = []
    for key, wanted in WANTED.items():
        spec = tomllib.loads((DATA / f"build/specs/liquids/{key}.toml").read_text("utf-8"))
        scale = {"density": 1000.0 * spec["molar_mass"]["value"]}
        for prop, temperatures in wanted.items():
            node = found[spec["cas"]].find(TAGS[prop])
            assert node is not None, (key, prop)
            for T in temperatures:
                v = value(node, T) * scale.get(prop, 1.0)
                rows.append([key, prop, f"{T:.2f}", f"{v:.5g}", "equation"])
    head = [
        "# source: ChemSep pure component data, version 8.32 (Kooijman H.A., Taylor R.)",
        "# seen: its file as it ships with the open-source library chemicals 1.5.2",
        "# uncertainty: not stated",
        EVALUATED,
    ]
    write("ChemSep2022_solvents", head, rows)


# source: head, thermo's name of the method, and for each liquid the temperatures [K]
PRESSURES: dict[str, tuple[str, str, dict[str, tuple[float, ...]]]] = {
    "LandoltBornstein1999": (
        "# source: Landolt-Boernstein, New Series IV/20, Vapor Pressure of Chemicals (1999-2001), "
        "Antoine constants",
        "LANDOLT",
        {
            "n-methyl-2-pyrrolidone": (338.15, 353.15, 383.15, 413.15, 443.15, 473.15),
            "2-pyrrolidone": (398.15, 423.15, 453.15, 483.15, 513.15),
            "tetralin": (313.15, 338.15, 363.15, 388.15, 413.15),
            "ethanolamine": (343.15, 363.15, 383.15, 403.15, 423.15, 443.15),
        },
    ),
    "NISTWebBookAntoine": (
        "# source: NIST Chemistry WebBook, Antoine constants of the phase-change pages",
        "ANTOINE_WEBBOOK",
        {
            "1-2-dimethoxyethane": (253.15, 273.15, 293.15, 303.15, 313.15),
            "tetralin": (373.15, 393.15, 413.15),
            "ethanolamine": (343.15, 363.15, 383.15, 403.15, 423.15, 443.15),
            "cis-decalin": (373.15, 393.15, 413.15),
        },
    ),
    "Poling2001": (
        "# source: Poling B.E., Prausnitz J.M., O'Connell J.P., The Properties of Gases and "
        "Liquids, 5th ed. (2001), appendix A, Wagner constants",
        "WAGNER_POLING",
        {"1-2-dimethoxyethane": (308.15, 323.15, 338.15, 353.15, 373.15, 390.15)},
    ),
}


def pressures() -> None:
    """Vapour pressures of three collections."""
    warnings.simplefilter("ignore")
    from thermo import VaporPressure

    for source, (head, method, wanted) in PRESSURES.items():
        rows = []
        for key, temperatures in wanted.items():
            known = VaporPressure(CASRN=cas(key))
            for T in temperatures:
                v = float(known.calculate(T, method))
                rows.append([key, "vapour_pressure", f"{T:.2f}", f"{v:.5g}", "equation"])
        lines = [head, COPY, "# uncertainty: not stated in the copy", EVALUATED]
        write(f"{source}_solvents" if source != "Poling2001" else f"{source}_ethers", lines, rows)


def saturation_table() -> None:
    """The one liquid of the VDI tables that the reference tables lack: methyl tert-butyl ether."""
    table = json.loads((MISC / "VDI Saturation Compounds Data.json").read_text("utf-8"))
    key = "methyl_tert-butyl_ether"
    given = table[cas(key)]
    rows = []
    for prop, column in (
        *(("density", "Density (l)"), ("viscosity", "Mu (l)"), ("surface_tension", "sigma")),
    ):
        for T, v in zip(given["T"][:5], given[column][:5], strict=True):
            rows.append([key, prop, f"{T:g}", f"{v:g}", "table"])
    head = [
        "# source: VDI Heat Atlas, 2nd ed. (2010), section D3, saturation table of MTBE",
        COPY,
        "# uncertainty: not stated in the copy",
    ]
    write("VDIHeatAtlas2010_ethers", head, rows)


def main() -> None:
    """Write every file."""
    chemsep()
    pressures()
    saturation_table()


if __name__ == "__main__":
    main()
