"""Values of published equations for liquid metals and melts, written to `data/published`.

    python data/build/evaluate_metals.py

Coefficients stand here digit for digit as they were seen, or are read from the data files of the
open-source libraries chemicals and thermo. What comes out is a formula's value at a few round
temperatures, not a measurement, and every file says so. Equations that a record takes as published
are in the record's spec; here are those that it is compared with or fitted to.
"""

from __future__ import annotations

import csv
import json
import math
from collections.abc import Callable
from pathlib import Path

import chemicals
import thermo
from compact_points import compact

HERE = Path(__file__).resolve().parent
PUBLISHED = HERE.parent / "published" / "liquids"
CHEMICALS = Path(chemicals.__file__).parent
THERMO = Path(thermo.__file__).parent
NOTE = "# note: values of an equation at round temperatures, made here, not measurements"
R = 8.31446261815324
CALORIE = 4.184

CAS = {
    "7440-55-3": "gallium",
    "7440-74-6": "indium",
    "7440-31-5": "tin",
    "7439-92-1": "lead",
    "7440-69-9": "bismuth",
    "7440-36-0": "antimony",
    "7440-66-6": "zinc",
    "7429-90-5": "aluminium",
    "7440-50-8": "copper",
    "7440-22-4": "silver",
    "7439-93-2": "lithium",
    "7440-23-5": "sodium",
    "7439-95-4": "magnesium",
    "7440-09-7": "potassium",
    "7440-43-9": "cadmium",
    "7440-57-5": "gold",
    "7440-02-0": "nickel",
    "7439-89-6": "iron",
    "7440-21-3": "silicon",
    "7704-34-9": "sulfur",
}
# kg/mol, of the element table of chemicals 1.5.2
MOLAR = {
    "gallium": 0.069723,
    "indium": 0.114818,
    "tin": 0.11871,
    "lead": 0.2072,
    "bismuth": 0.20898,
    "antimony": 0.12176,
    "zinc": 0.065409,
    "aluminium": 0.026982,
    "copper": 0.063546,
    "silver": 0.107868,
    "lithium": 0.006941,
    "sodium": 0.02299,
    "magnesium": 0.024305,
    "potassium": 0.039098,
    "cadmium": 0.112411,
    "gold": 0.196967,
    "nickel": 0.058693,
    "iron": 0.055845,
    "silicon": 0.028086,
    "sulfur": 0.032065,
}
Row = tuple[str, str, float, float]


def grid(low: float, high: float, count: int = 5) -> list[float]:
    """Round temperatures from end to end of a range."""
    low, high = math.ceil(low), math.floor(high)
    return [float(round(low + (high - low) * i / (count - 1))) for i in range(count)]


def values(
    liquid: str, prop: str, f: Callable[[float], float], low: float, high: float, count: int = 5
) -> list[Row]:
    return [(liquid, prop, T, f(T)) for T in grid(low, high, count)]


def write(name: str, head: list[str], rows: list[Row], what: str = "equation") -> None:
    """A published file; spots stand as printed, equations with five figures."""
    path = PUBLISHED / f"{name}.csv"
    with path.open("w", encoding="utf-8", newline="") as handle:
        handle.write("\n".join([*head, "liquid,property,T_K,value,doi"]) + "\n")
        writer = csv.writer(handle, lineterminator="\n")
        for liquid, prop, T, value in rows:
            writer.writerow([liquid, prop, f"{T:.8g}", f"{value:.5g}", what])
    compact(path)


def table(path: str) -> dict[str, list[str]]:
    """Rows of a table of chemicals by CAS number."""
    lines = (CHEMICALS / path).read_text(encoding="utf-8").splitlines()
    return {row[0]: row for row in csv.reader(lines, delimiter="\t") if row}


def crc_density() -> list[Row]:
    """Those that differ from the reference correlations: aluminium, tin, copper, iron are them."""
    rows: list[Row] = []
    same = {"aluminium", "tin", "copper", "iron"}
    for cas, row in table(
        "Density/CRC Inorganics densties of molten compounds and salts.tsv"
    ).items():
        liquid = CAS.get(cas)
        if liquid is None or liquid in same or liquid == "sulfur":
            continue
        rho, k, low, high = (float(x) for x in row[3:7])
        rows += values(
            liquid, "density", lambda T, a=rho, b=k, c=low: a - b * (T - c), low, high, 4
        )
    return rows


def viswanath() -> list[Row]:
    """log10(viscosity / mPa s) = A + B/(C - T)."""
    rows: list[Row] = []
    for cas, row in table("Viscosity/Viswanath Natarajan Dynamic 3 term.tsv").items():
        if cas not in CAS:
            continue
        a, b, c, low, high = (float(x) for x in row[3:8])
        high = min(high, 1200.0)
        rows += values(
            CAS[cas],
            "viscosity",
            lambda T, a=a, b=b, c=c: 1e-3 * 10 ** (a + b / (c - T)),
            low,
            high,
        )
    return rows


def thermo_fit() -> tuple[list[Row], list[Row]]:
    """Surface tension (Somayajulu's form) and thermal conductivity; metals, then sulfur."""
    data = json.loads((THERMO / "Misc" / "elements.json").read_text(encoding="utf-8"))
    metals: list[Row] = []
    sulfur: list[Row] = []
    for cas, liquid in CAS.items():
        rows = sulfur if liquid == "sulfur" else metals
        entry = data.get(cas, {})
        for parameters in entry.get("SurfaceTension", {}).values():
            p = parameters["Fit 2023"]
            high = p["Tmax"] if liquid != "sulfur" else 433.0

            def tension(T: float, p: dict[str, float] = p) -> float:
                x = 1.0 - T / p["Tc"]
                return sum(p[f"sigma{i}"] * x ** p[f"n{i}"] for i in range(3))

            rows += values(liquid, "surface_tension", tension, p["Tmin"], high)
        for parameters in entry.get("ThermalConductivityLiquid", {}).values():
            p = parameters["Fit 2023"]
            high = min(p["Tmax"], 2000.0) if liquid != "sulfur" else 433.0

            def conductivity(T: float, p: dict[str, float] = p) -> float:
                return sum(p[letter] * T**i for i, letter in enumerate("ABCDEFG"))

            rows += values(liquid, "thermal_conductivity", conductivity, p["Tmin"], high)
    return metals, sulfur


def janaf() -> tuple[list[Row], list[Row]]:
    """Tabulated heat capacity of the liquid, J/(mol K), divided by the molar mass."""
    data = json.loads((CHEMICALS / "Heat Capacity" / "JANAF_1998_liq_Cp.json").read_text())
    from thermo.heat_capacity import HeatCapacityLiquid

    metals: list[Row] = []
    sulfur: list[Row] = []
    melts = table("Density/CRC Inorganics densties of molten compounds and salts.tsv")
    for cas, liquid in CAS.items():
        if cas not in data:
            continue
        one = HeatCapacityLiquid(CASRN=cas)
        Ts, Cps = one.tabular_data.get("JANAF", (None, None)) if one.tabular_data else (None, None)
        if Ts is None:
            Ts, Cps = data[cas][0], data[cas][1]
        low = float(melts[cas][5])
        high = 433.0 if liquid == "sulfur" else min(low + 900.0, 2400.0)
        chosen = [(T, c) for T, c in zip(Ts, Cps, strict=True) if low <= T <= high]
        step = max(1, len(chosen) // 5)
        for T, c in chosen[::step]:
            (sulfur if liquid == "sulfur" else metals).append(
                (liquid, "heat_capacity", T, c / MOLAR[liquid])
            )
    return metals, sulfur


def unary() -> tuple[list[Row], list[Row]]:
    """Heat capacity of the liquid by the pure-element functions of Dinsdale (SGTE)."""
    from thermo.heat_capacity import HeatCapacityLiquid

    rows: list[Row] = []
    sulfur: list[Row] = []
    melts = table("Density/CRC Inorganics densties of molten compounds and salts.tsv")
    for cas, liquid in CAS.items():
        one = HeatCapacityLiquid(CASRN=cas)
        low = float(melts[cas][5])
        here = (390.0, 395.0, 400.0) if liquid == "sulfur" else grid(low, low + 600.0, 6)
        for T in here:
            (sulfur if liquid == "sulfur" else rows).append(
                (liquid, "heat_capacity", T, one.calculate(T, "UNARY") / MOLAR[liquid])
            )
    return rows, sulfur


def webbook_vapour() -> list[Row]:
    """Vapour pressure by the Antoine equations of the NIST WebBook (Stull 1947 and others).

    Those of aluminium (40 times too high), tin (three times), sodium and potassium are left out.
    """
    from thermo.vapor_pressure import VaporPressure

    rows: list[Row] = []
    names = {liquid: cas for cas, liquid in CAS.items()}
    limits = {
        "antimony": (1058.0, 1373.0),
        "lithium": (700.0, 1500.0),
    }
    for liquid, (low, high) in limits.items():
        one = VaporPressure(CASRN=names[liquid])
        for T in grid(low, high):
            rows.append((liquid, "vapour_pressure", T, one.calculate(T, "ANTOINE_WEBBOOK")))
    return rows


def alcock_heat() -> list[Row]:
    """Heat of vaporisation by Clausius and Clapeyron for metals whose vapour is of single atoms."""
    rows: list[Row] = []
    skip = {"lithium", "sodium", "potassium"}  # their vapour holds pairs of atoms
    path = "Vapor Pressure/Alcock_Itkin_Horrigan_metalic_elements.tsv"
    for cas, row in table(path).items():
        liquid = CAS.get(cas)
        if liquid is None or liquid in skip:
            continue
        _, b, c, d, e, low, high = (float(x) for x in row[2:9])

        def heat(T: float, b: float = b, c: float = c, d: float = d, liquid: str = liquid) -> float:
            return R * (-b + c * T + d * T * T) / MOLAR[liquid]

        assert e == 1.0
        rows += values(liquid, "heat_of_vaporisation", heat, low, high, 4)
    return rows


def nea() -> list[Row]:
    """Handbook on Lead-bismuth Eutectic Alloy and Lead Properties, ed. 2015; T in K."""
    lead, bismuth = "lead", "bismuth"
    rows: list[Row] = []
    rows += values(lead, "density", lambda T: 11441 - 1.2795 * T, 600.6, 1900)
    rows += values(bismuth, "density", lambda T: 10725 - 1.22 * T, 544.6, 1500)
    rows += values(lead, "viscosity", lambda T: 4.55e-4 * math.exp(1069 / T), 600.6, 1400)
    rows += values(bismuth, "viscosity", lambda T: 4.456e-4 * math.exp(780 / T), 544.6, 1000)
    rows += values(lead, "surface_tension", lambda T: 1e-3 * (525.9 - 0.113 * T), 600.6, 1300)
    rows += values(bismuth, "surface_tension", lambda T: 1e-3 * (420.8 - 0.081 * T), 544.6, 1400)
    rows += values(lead, "thermal_conductivity", lambda T: 9.2 + 0.011 * T, 600.6, 1300)
    rows += values(bismuth, "thermal_conductivity", lambda T: 7.34 + 0.0095 * T, 544.6, 1000)
    rows += values(lead, "vapour_pressure", lambda T: 5.76e9 * math.exp(-22131 / T), 601, 1200)
    return rows


def lithium_collection() -> dict[str, tuple[list[str], list[Row]]]:
    """Correlations by author in a public script on lithium for fusion devices."""
    seen = "# seen: public Python script that lists lithium correlations by author; works not seen"
    li = "lithium"
    jeppson = values(li, "density", lambda T: 515 - 0.101 * (T - 473.15), 473.15, 1600)
    jeppson += values(
        li, "surface_tension", lambda T: 1e-3 * (0.16 * (3550 - T) - 95), 473.15, 1573
    )
    jeppson += values(
        li,
        "heat_capacity",
        lambda T: 1e3 * CALORIE * (1.14 - 5.06e-4 * (T - 273.15) + 4.45e-7 * (T - 273.15) ** 2),
        473.15,
        873.15,
    )
    jeppson += values(
        li, "vapour_pressure", lambda T: 133.322368 * 10 ** (8.0 - 8143 / T), 700, 1400
    )
    return {
        "Jeppson1978_metals": (
            ["# source: Jeppson D.W. et al. (1978), lithium properties", seen,
             "# uncertainty: not stated in the copy", NOTE],
            jeppson,
        ),
        "Buxbaum1982_metals": (
            ["# source: Buxbaum (1982), viscosity of lithium", seen,
             "# uncertainty: not stated in the copy", NOTE],
            values(
                li,
                "viscosity",
                lambda T: 1e-3 * 10 ** (1.4936 - 0.7368 * math.log10(T) + 109.95 / T),
                458.15,
                1273.15,
            ),
        ),
        "Davison1968_metals": (
            ["# source: Davison H.W., NASA TN D-4650 (1968)", seen,
             "# uncertainty: not stated in the copy", NOTE],
            values(
                li,
                "thermal_conductivity",
                lambda T: 21.874 + 5.6255e-2 * T - 1.8325e-5 * T * T,
                453.7,
                1610,
            ),
        ),
        "Calaway1982_metals": (
            ["# source: Calaway (1982), electrical resistivity of lithium in microohm m", seen,
             "# uncertainty: not stated in the copy", NOTE],
            values(
                li,
                "electrical_conductivity",
                lambda T: (
                    1e6
                    / (
                        0.1891
                        + 3.680e-4 * (T - 273.15)
                        - 1.639e-7 * (T - 273.15) ** 2
                        + 7.507e-11 * (T - 273.15) ** 3
                    )
                ),
                454.15,
                1273.15,
            ),
        ),
    }  # fmt: skip


def small_files() -> dict[str, tuple[list[str], list[Row], str]]:
    """Single equations and spots: metals."""
    brillo = values("aluminium", "density", lambda T: 2360 - 0.33 * (T - 933), 933, 1233, 4)
    brillo += values("copper", "density", lambda T: 7920 - 0.76 * (T - 1358), 1358, 1658, 4)
    egry = values("copper", "surface_tension", lambda T: 1.339 - 1.8e-4 * (T - 1357), 1360, 1480, 4)
    egry += values(
        "silver", "surface_tension", lambda T: 0.914 - 1.5e-4 * (T - 1234), 1360, 1480, 4
    )
    egry += values("gold", "surface_tension", lambda T: 1.162 - 1.8e-4 * (T - 1338), 1360, 1480, 4)
    spots = [
        ("gallium", 302.91, 0.718),
        ("indium", 429.75, 0.556),
        ("tin", 505.08, 0.560),
        ("zinc", 692.68, 0.782),
        ("magnesium", 923.15, 0.559),
        ("lithium", 453.65, 0.398),
        ("sodium", 370.94, 0.191),
    ]
    sodium = values(
        "sodium",
        "viscosity",
        lambda T: _coolprop("V", T),
        400.0,
        900.0,
        4,
    )
    return {
        "Brillo2016_metals": (
            ["# source: Brillo J., Thermophysical Properties of Multicomponent Liquid Alloys, "
             "De Gruyter 2016: density by electromagnetic levitation",
             "# seen: coefficients in the data files of the open-source library auxi-mpp 3.0.0; "
             "book not seen", "# uncertainty: 1.5 %, of the copy", NOTE],
            brillo, "equation"),
        "Assael2012eutectics_metals": (
            [
                "# source: Assael M.J. et al., J. Phys. Chem. Ref. Data 41 (2012) 033103: density "
                "of Pb + Bi, 10484 - 1.1 (T - 400 K)",
                "# seen: coefficients in the data files of the open-source library auxi-mpp 3.0.0; "
                "abstract read, paper not seen",
                "# uncertainty: 2.9 % at 95 %",
                NOTE,
            ],
            values("lead_bismuth_eutectic", "density", lambda T: 10484 - 1.1 * (T - 400), 400, 1200),
            "equation",
        ),
        "Egry2010_metals": (
            ["# source: Egry I., Ricci E., Novakovic R., Ozawa S., Adv. Colloid Interface Sci. 159 "
             "(2010) 198, doi:10.1016/j.cis.2010.06.009",
             "# seen: lines with that name in a table of a public simulation program; paper not seen",
             "# uncertainty: not stated in the copy", NOTE],
            egry, "equation"),
        "MeltingPointTensions_metals": (
            ["# source: surface tension at the melting point, of a public script that names "
             "Keene 1993 and Iida & Guthrie 1988 without saying which gave which",
             "# seen: the script; works not seen",
             "# uncertainty: not stated; a second script by the same hand has 1050 where this one has "
             "1140 mN/m for aluminium and 1285 where it has 1330 for copper: these two left out",
             "# note: temperature: the melting point of the CRC handbook"],
            [(liquid, "surface_tension", T, value) for liquid, T, value in spots], "spot"),
        "CoolPropSodium_metals": (
            ["# source: incompressible liquid LiqNa of CoolProp 8.0.0; origin not looked up there",
             "# seen: computed with that library", "# uncertainty: not stated", NOTE],
            sodium, "equation"),
    }  # fmt: skip


def _coolprop(letter: str, T: float) -> float:
    from CoolProp.CoolProp import PropsSI

    return float(PropsSI(letter, "T", T, "P", 1e5, "INCOMP::LiqNa"))


def melts() -> dict[str, tuple[list[str], list[Row], str]]:
    """Sulfur, molten salt, urea."""
    salt = "sodium_potassium_nitrate"

    def ideal(T: float) -> float:
        nitrates = (1900 - 0.715 * (T - 579.65), 1865 - 0.723 * (T - 607.15))
        return 1.0 / (0.6 / nitrates[0] + 0.4 / nitrates[1])

    vdi_surface = values(
        "sulfur",
        "surface_tension",
        lambda T: 0.08603 * (1 - T / 1312.95) ** 1.00082,
        388.45,
        433.0,
        4,
    )
    # 0.00031 ... cal/(cm s K)
    page = [
        ("sulfur", "thermal_conductivity", 273.15 + t, c * 100 * CALORIE)
        for t, c in ((120, 0.00031), (140, 0.00032), (160, 0.00033))
    ]
    viscosity = [
        ("sulfur", "viscosity", 273.15 + t, 1e-3 * v)
        for t, v in ((120, 11.0), (130, 9.5), (140, 8.2), (150, 7.4), (155, 7.0))
    ]
    script = [
        ("sulfur", "density", 273.15 + t, 1819 - 0.784 * (t - 120)) for t in (120, 135, 150, 160)
    ]
    script += [
        ("sulfur", "surface_tension", 273.15 + t, 0.0608 - 7.0e-5 * (t - 120))
        for t in (120, 135, 150, 160)
    ]
    return {
        "CRCHandbook2014_melts": (
            ["# source: CRC Handbook of Chemistry and Physics, density of molten compounds and "
             "salts: sodium nitrate 1900 - 0.715 (T - 579.65), potassium nitrate "
             "1865 - 0.723 (T - 607.15) kg/m3, mixed here at 60 to 40 by mass with ideal volumes",
             "# seen: data file of the open-source library chemicals 1.5.2; handbook not seen",
             "# uncertainty: that of ideal mixing, a few tenths of a percent (estimate)", NOTE],
            values(salt, "density", ideal, 580.0, 730.0, 4), "equation"),
        "VDIHeatAtlas2010_melts": (
            ["# source: VDI Heat Atlas, 2nd ed. (2010), PPDS equation of sulfur, "
             "0.08603 (1 - T/1312.95)^1.00082 N/m",
             "# seen: data file of the open-source library chemicals 1.5.2; handbook not seen",
             "# uncertainty: not stated in the copy", NOTE],
            vdi_surface, "equation"),
        "AtomistrySulphur_melts": (
            ["# source: page Physical Properties of Sulphur, atomistry.com: thermal conductivity of "
             "the liquid 0.00031, 0.00032, 0.00033 at 120, 140, 160 degC",
             "# seen: text copy of the page", "# uncertainty: last digit, 3 %",
             "# note: the page has no unit; cal/(cm s K) makes it agree with the other source"],
            page, "spot"),
        "BaconFanelli1943_melts": (
            ["# source: Bacon R.F., Fanelli R., J. Am. Chem. Soc. 65 (1943) 639 and Touro F.J., "
             "Wiewiorowski T.K. (1966), viscosity of sulfur",
             "# seen: anchor points in a public program that names these two; papers not seen",
             "# uncertainty: read here as 5 %",
             "# note: above 159 degC the same list rises to 93 Pa s at 187 degC: left out"],
            viscosity, "spot"),
        "SulfurCondenserProgram_melts": (
            ["# source: linear equations of sulfur's density and surface tension in a public program "
             "for sulfur condensers; origin not named there", "# seen: the program",
             "# uncertainty: not stated", NOTE],
            script, "equation"),
        "OpenFOAM_melts": (
            ["# source: OpenFOAM 7, liquid properties of urea: density 1230 kg/m3, constant",
             "# seen: file of the program", "# uncertainty: not stated",
             "# note: its viscosity (0.20 mPa s) is ten times too low, its surface tension a "
             "placeholder: not used"],
            [("urea_melt", "density", 408.15, 1230.0)], "spot"),
        "UreaPrillingProgram_melts": (
            ["# source: properties of molten urea in a public program for a prilling tower: "
             "1240 kg/m3 ('about 1230-1250'), 2000 J/(kg K); origin not named there",
             "# seen: the program", "# uncertainty: 1 %"],
            [("urea_melt", "density", 408.15, 1240.0),
             ("urea_melt", "heat_capacity", 408.15, 2000.0)], "spot"),
    }  # fmt: skip


def lines(source: str, seen: str, uncertainty: str) -> list[str]:
    return [f"# source: {source}", f"# seen: {seen}", f"# uncertainty: {uncertainty}", NOTE]


def main() -> None:
    copied = "data file of the open-source library chemicals 1.5.2; work not seen"
    write(
        "CRCHandbook2014_metals",
        lines(
            "CRC Handbook of Chemistry and Physics, density of molten elements: a - b (T - Tm); "
            "boiling point of sodium",
            copied,
            "not stated in the copy",
        ),
        [*crc_density(), ("sodium", "vapour_pressure", 1156.09, 101325.0)],
    )
    write(
        "ViswanathNatarajan1989_metals",
        lines(
            "Viswanath D.S., Natarajan G., Data Book on the Viscosity of Liquids, 1989: "
            "log10(viscosity / mPa s) = A + B/(C - T)",
            copied,
            "not stated in the copy",
        ),
        viswanath(),
    )
    metals, sulfur = thermo_fit()
    for suffix, rows in (("metals", metals), ("melts", sulfur)):
        write(
            f"ThermoFit2023_{suffix}",
            lines(
                "fits of published values named 'Fit 2023' in the open-source library thermo 0.6.1",
                "coefficients in the library's data file; the fitted data are not named there",
                "not stated",
            ),
            rows,
        )
    metals, sulfur = janaf()
    for suffix, rows in (("metals", metals), ("melts", sulfur)):
        write(
            f"Chase1998_{suffix}",
            lines("Chase M.W., NIST-JANAF Thermochemical Tables, 4th ed. (1998)", copied, "1 %")[
                :3
            ],
            rows,
            "table",
        )
    write(
        "NISTWebBookAntoine_metals",
        lines(
            "NIST Chemistry WebBook, Antoine equations (most of them from Stull 1947)",
            "coefficients in the open-source library thermo 0.6.1; page not seen",
            "not stated; hand-drawn curves of 1947 behind most",
        ),
        webbook_vapour(),
    )
    metals, sulfur = unary()
    for suffix, rows in (("metals", metals), ("melts", sulfur)):
        write(
            f"Dinsdale1991_{suffix}",
            lines(
                "Dinsdale A.T., SGTE data for pure elements, Calphad 15 (1991) 317",
                "functions in a data file of the open-source library thermo 0.6.1; paper not seen",
                "not stated",
            ),
            rows,
        )
    write(
        "Alcock1984_metals",
        lines(
            "Alcock C.B., Itkin V.P., Horrigan M.K., Can. Metall. Q. 23 (1984) 309: slope of the "
            "vapour pressure equation, ideal vapour of single atoms",
            copied,
            "2 % (estimate)",
        ),
        alcock_heat(),
    )
    write(
        "NEAHandbook2015_metals",
        lines(
            "OECD/NEA, Handbook on Lead-bismuth Eutectic Alloy and Lead Properties, Materials "
            "Compatibility, Thermal-hydraulics and Technologies, ed. 2015, NEA 7268",
            "coefficients in the open-source library lbh15 2.1.0, which implements it; not seen",
            "not in the copy",
        ),
        nea(),
    )
    for name, (head, rows) in lithium_collection().items():
        write(name, head, rows)
    for name, (head, rows, what) in (small_files() | melts()).items():
        write(name, head, rows, what)


if __name__ == "__main__":
    main()
