"""Points of water with organic liquids that no reference table holds: typed here, or evaluated.

    python data/build/aqueous_tables.py

Writes to `data/published/mixtures`. Rows as printed where seen, in SI by powers of ten; where only
a formula was seen, it is evaluated at a few round conditions and the file says so.
"""

from __future__ import annotations

import csv
from collections.abc import Iterable, Sequence
from math import exp
from pathlib import Path

from compact_points import compact

MIXTURES = Path(__file__).resolve().parent.parent / "published" / "mixtures"
HEADER = ["component_1", "component_2", "basis", "fraction_1", "T_K", "property", "value", "doi"]

Row = tuple[str, str, str, str, str, str, str, str]

# Mass %, density g/cm3, refractive index, viscosity mPa*s; 20 degC. About one row in three.
CRC = {
    "acetic_acid": """
        2 1.0011 1.3345 1.042; 5 1.0052 1.3366 1.105; 10 1.0121 1.3402 1.21; 15 1.0187 1.3437 1.32;
        20 1.025 1.3472 1.431; 26 1.0323 1.3512 1.572; 32 1.0391 1.355 1.715; 38 1.0454 1.3586 1.852;
        44 1.051 1.3621 2.007; 50 1.0562 1.3653 2.158; 56 1.0605 1.3682 2.308; 60 1.0629 1.37 2.409;
        66 1.0659 1.3724 2.553; 70 1.0673 1.3738 2.629; 76 1.068 1.3757 2.714; 80 1.068 1.3767 2.72;
        84 1.0673 1.3773 2.658; 88 1.0658 1.3774 2.511; 92 1.0629 1.3766 2.24; 96 1.0578 1.3748 1.813;
        98 1.0538 1.3734 1.535""",
    "acetone": """
        1 0.9968 1.3337 1.024; 2 0.9954 1.3344 1.047; 3 0.994 1.3352 1.072; 4 0.9926 1.3359 1.099;
        5 0.9912 1.3366 1.125; 6 0.9899 1.3373 1.15; 7 0.9886 1.3381 1.174; 8 0.9874 1.3388 1.198;
        10 0.9849 1.3402 1.244""",
    "formic_acid": """
        2 1.0029 1.3342 1.017; 5 1.0102 1.3359 1.039; 10 1.0224 1.3387 1.07; 14 1.0322 1.3408 1.094;
        18 1.0419 1.3428 1.119; 24 1.0562 1.3456 1.156; 28 1.0654 1.3475 1.179; 32 1.0746 1.3493 1.203;
        36 1.0839 1.3511 1.227; 40 1.0935 1.3529 1.254; 44 1.1015 1.3547 1.281; 48 1.1097 1.3565 1.309;
        52 1.1183 1.3581 1.34; 56 1.1273 1.3597 1.374; 60 1.1364 1.3612 1.41; 64 1.1456 1.3626 1.449;
        68 1.1544 1.3641 1.49; 70 1.1586 1.3648 1.511""",
    "1-propanol": """
        2 0.9946 1.3348 1.1; 4 0.9911 1.3366 1.208; 6 0.9882 1.3385 1.325; 8 0.9855 1.3404 1.449;
        10 0.9829 1.3423 1.577; 12 0.9804 1.3442 1.71; 14 0.9779 1.346 1.849; 16 0.9749 1.3477 1.986;
        18 0.9719 1.3494 2.106; 20 0.9686 1.351 2.218; 24 0.9612 1.3539 2.432; 28 0.9533 1.3566 2.612;
        32 0.9452 1.3592 2.765; 36 0.937 1.3614 2.9; 40 0.9288 1.3635 3.01; 60 0.8875 1.3734 3.186;
        80 0.847 1.3812 2.822""",
    "2-propanol": """
        2 0.9939 1.3346 1.112; 4 0.9902 1.3364 1.225; 6 0.9871 1.3382 1.352; 8 0.9843 1.34 1.485;
        10 0.9816 1.342 1.629; 12 0.9793 1.3439 1.794; 14 0.9772 1.3459 1.97; 16 0.9751 1.3478 2.16;
        18 0.9725 1.3496 2.352; 20 0.9696 1.3514 2.55; 40 0.9302 1.3642; 60 0.8824 1.3717;
        80 0.8341 1.3742""",
    "ethanol": """
        20 0.9687 1.3469 2.142; 30 0.9539 1.3535 2.667; 40 0.9352 1.3583 2.846;
        50 0.9139 1.3616 2.813; 60 0.8911 1.3638 2.547; 70 0.8676 1.3652 2.214; 80 0.8436 1.3658 1.881;
        90 0.818 1.365 1.542""",
}  # fmt: skip

# Archive rows: mole fraction of component 1 (or water where marked), value in SI, K; by DOI.
DMF_VISCOSITY = {  # mole fraction of water
    "0.1": "0.0009018", "0.2": "0.0010386", "0.3": "0.0012331", "0.4": "0.0015078",
    "0.5": "0.0018528", "0.6": "0.0022264", "0.7": "0.0024775", "0.8": "0.0023495",
    "0.9": "0.0017464", "0.94": "0.0014116",
}  # fmt: skip
NMP_VISCOSITY = {
    "0.0501": "0.00174", "0.0701": "0.002137", "0.1001": "0.002762", "0.2004": "0.004555",
    "0.3004": "0.005062", "0.4012": "0.004505", "0.503": "0.003729",
}  # fmt: skip
NMP_VISCOSITY_WATER = {"0.0522": "0.001721", "0.1684": "0.001985", "0.2465": "0.002147",
                       "0.3481": "0.002535"}  # fmt: skip
PYRROLIDONE_VISCOSITY_WATER = {
    "0.0549": "0.01302", "0.1506": "0.012295", "0.2552": "0.011766", "0.35": "0.011319",
    "0.4496": "0.01063", "0.5": "0.010127", "0.5566": "0.009408", "0.6422": "0.008014",
    "0.7532": "0.005772", "0.8516": "0.003645", "0.9": "0.002651", "0.9526": "0.001667",
    "0.9906": "0.001036",
}  # fmt: skip
PROPANOL_2_VISCOSITY = {  # mass fraction
    "288.15": ("0.001936", "0.003087", "0.004014"), "293.15": ("0.001633", "0.002485", "0.003172"),
    "298.15": ("0.001395", "0.002045", "0.002555"), "303.15": ("0.001208", "0.00171", "0.002105"),
}  # fmt: skip

# From memory: mass %, mN/m, at one temperature.
RECALLED = {
    ("acetone", "298.15"): "5 55.50; 10 48.90; 20 41.10; 50 30.40; 75 26.80; 95 24.20",
    ("acetic_acid", "303.15"): "1.000 68.00; 2.475 64.40; 5.001 60.10; 10.01 54.60; 30.09 43.60;"
    " 49.96 38.40; 69.91 34.30",
    ("formic_acid", "303.15"): "1.00 70.07; 5.00 66.20; 10.00 62.78; 25.00 56.29; 50.00 49.50;"
    " 75.00 43.40",
}  # fmt: skip
VAZQUEZ_1_PROPANOL = ("41.83", "34.32", "27.84", "25.98", "25.26", "24.80", "24.49", "24.08",
                      "23.86", "23.59")  # fmt: skip

# Redlich-Kister coefficients, mN/m, organic liquid first, and its end; water 71.97 mN/m.
RAFATI = {
    "ethylene_glycol": ((-32.16, 21.70, -9.78, 18.05, -24.61), 48.22,
                        ("0.05", "0.1", "0.2", "0.3", "0.5", "0.7", "0.9")),
    "acetonitrile": ((-78.71, 76.03, 5.12, 95.1, -308.86), 28.25,
                     ("0.05", "0.1", "0.2", "0.3", "0.5", "0.7")),
}  # fmt: skip


def shifted(text: str, power: int) -> str:
    """A printed number times a power of ten, digit for digit."""
    return f"{float(text) * 10.0**power:.10g}"


def from_mole(first: str, pairs: dict[str, str], T: str, prop: str, doi: str) -> list[Row]:
    return [(first, "water", "mole", x, T, prop, value, doi) for x, value in pairs.items()]


def of_water(first: str, pairs: dict[str, str], T: str, prop: str, doi: str) -> list[Row]:
    turned = {f"{1.0 - float(x):.6g}": value for x, value in pairs.items()}
    return from_mole(first, turned, T, prop, doi)


def mass_rows(first: str, T: str, prop: str, text: str, doi: str = "") -> list[Row]:
    rows = []
    for entry in text.split(";"):
        w, value = entry.split()
        rows.append((first, "water", "mass", shifted(w, -2), T, prop, shifted(value, -3), doi))
    return rows


def write(name: str, head: Sequence[str], rows: Iterable[Row]) -> None:
    path = MIXTURES / f"{name}.csv"
    with path.open("w", encoding="utf-8", newline="") as handle:
        handle.writelines(f"# {line}\n" for line in head)
        writer = csv.writer(handle, lineterminator="\n")
        writer.writerow(HEADER)
        writer.writerows(sorted(set(rows)))
    compact(path)


def handbook() -> list[Row]:
    rows: list[Row] = []
    for key, text in CRC.items():
        for entry in text.split(";"):
            w, density, index, *viscosity = entry.split()
            place = (key, "water", "mass", shifted(w, -2), "293.15")
            if key != "ethanol":
                rows.append((*place, "density", shifted(density, 3), ""))
            rows.append((*place, "refractive_index", index, ""))
            if viscosity and viscosity[0] != "-":
                rows.append((*place, "viscosity", shifted(viscosity[0], -3), ""))
    return rows


def archive() -> list[Row]:
    rows = of_water("dimethylformamide", DMF_VISCOSITY, "298.15", "viscosity", "10.1021/je300608v")
    rows += from_mole(
        "n-methyl-2-pyrrolidone", NMP_VISCOSITY, "298.15", "viscosity", "10.1021/je034073k"
    )
    rows += of_water(
        "n-methyl-2-pyrrolidone", NMP_VISCOSITY_WATER, "298.15", "viscosity", "10.1021/je0340809"
    )
    rows += of_water(
        "2-pyrrolidone", PYRROLIDONE_VISCOSITY_WATER, "298.15", "viscosity", "10.1021/je0340809"
    )
    for T, values in PROPANOL_2_VISCOSITY.items():
        for w, value in zip(("0.1", "0.2", "0.3"), values, strict=True):
            rows.append(
                ("2-propanol", "water", "mass", w, T, "viscosity", value,
                 "10.1016/j.jct.2019.105880")
            )  # fmt: skip
    return rows


def rafati() -> list[Row]:
    rows: list[Row] = []
    for key, (coefficients, end, places) in RAFATI.items():
        for place in places:
            x = float(place)
            y = x * end + (1.0 - x) * 71.97
            y += x * (1.0 - x) * sum(a * (2.0 * x - 1.0) ** k for k, a in enumerate(coefficients))
            rows.append(
                (key, "water", "mole", place, "298.15", "surface_tension", f"{y / 1000.0:.5f}",
                 "equation")
            )  # fmt: skip
    return rows


def hexanediol() -> list[Row]:
    rows: list[Row] = []
    for w in (0.05, 0.1, 0.2, 0.3, 0.4, 0.5, 0.6, 0.7, 0.8, 0.9):
        eta = 0.001002 * exp(4.24996 * w - 0.224339 * w**2 - 3.45588 * w**3 + 3.84868 * w**4)
        rows.append(
            ("1-2-hexanediol", "water", "mass", f"{w:g}", "293.15", "viscosity", f"{eta:.4g}",
             "equation")
        )  # fmt: skip
    return rows


def absorber(w: float, T: float) -> tuple[float, float, float]:
    """Density, viscosity, surface tension of aqueous ethanolamine without carbon dioxide."""
    x = (w / 0.06108) / (w / 0.06108 + (1.0 - w) / 0.01802)
    pure = 61.08 / (-5.35162e-7 * T**2 - 4.51417e-4 * T + 1.19451)
    pure += (1.0 - x) * (-2.02049415703576 + 3.1506793296904 * x)
    water = 18.02 / (-3.2484e-6 * T**2 + 0.00165 * T + 0.793)
    density = 1000.0 * (x * 61.08 + (1.0 - x) * 18.02) / (x * pure + (1.0 - x) * water)
    r = 100.0 * w
    slope = T * (-0.0854041877181552 * r + 2.72913373574306)
    slope += 35.1158892542595 * r + 1805.52759876533
    t = 293.15 - T
    viscosity = 1.002e-3 * 10.0 ** ((1.3272 * t - 0.001053 * t**2) / (T - 168.15))
    viscosity *= exp(slope * r / T**2)
    amine = 0.09945 * (1.0 - T / 614.45) ** 1.067
    tr = T / 647.13
    s_water = 0.18548 * (1.0 - tr) ** (2.717 - 3.554 * tr + 2.047 * tr**2)
    g = 3.06684894924048 + 2.97502322396621 * w - 10.5738529301824 * w**2
    return density, viscosity, s_water + (amine - s_water) * g * x


def ethanolamine() -> list[Row]:
    rows: list[Row] = []
    for T in ("298.15", "313.15", "333.15", "353.15"):
        for w in ("0.1", "0.2", "0.3", "0.4"):
            density, viscosity, tension = absorber(float(w), float(T))
            place = ("ethanolamine", "water", "mass", w, T)
            rows.append((*place, "density", f"{density:.1f}", "equation"))
            rows.append((*place, "viscosity", f"{viscosity:.4g}", "equation"))
            rows.append((*place, "surface_tension", f"{tension:.4g}", "equation"))
    return rows


GERKE_N = {
    "293.15": ("1.42918", "1.42573", "1.4217", "1.41774", "1.40905", "1.39915", "1.38933"),
    "298.15": ("1.42763", "1.42394", "1.42004", "1.4162", "1.40751", "1.39784", "1.38809"),
    "303.15": ("1.42608", "1.42232", "1.4185", "1.41468", "1.40604", "1.39645", "1.38671"),
}
GERKE_VISCOSITY = {
    "293.15": ("41", "32.9", "25.5", "20.8", "13.8", "9.7", "6.65"),
    "298.15": ("32.6", "24.5", "20.1", "16.4", "11.2", "7.92", "5.52"),
    "303.15": ("25.4", "20.3", "16", "13.3", "9.14", "6.6", "4.62"),
}
GERKE_MASS = ("0.95", "0.9", "0.85", "0.8", "0.7", "0.6", "0.5")


def gerke() -> list[Row]:
    rows: list[Row] = []
    for T, indices in GERKE_N.items():
        for w, index, value in zip(GERKE_MASS, indices, GERKE_VISCOSITY[T], strict=True):
            place = ("propylene_glycol", "water", "mass", w, T)
            rows.append((*place, "refractive_index", index, ""))
            rows.append((*place, "viscosity", shifted(value, -3), ""))
    return rows


def antifreeze() -> list[Row]:
    """Viscosity of inhibited propylene glycol, by the equation of CoolProp (volume fractions)."""
    from CoolProp.CoolProp import PropsSI

    rows: list[Row] = []
    for T in ("313.15", "333.15", "353.15", "371.15"):
        for volume in (0.2, 0.3, 0.4, 0.5, 0.6):
            w = volume * 1036.1 / (volume * 1036.1 + (1.0 - volume) * 998.2)
            eta = PropsSI("V", "T", float(T), "P", 1e6, f"INCOMP::APG[{volume}]")
            place = ("propylene_glycol", "water", "mass", f"{w:.4f}", T)
            rows.append((*place, "viscosity", f"{eta:.4g}", "equation"))
    return rows


def main() -> None:
    write("CRCHandbook2021_organics", [
        "source: CRC Handbook of Chemistry and Physics, 102nd edition (J. Rumble, ed., 2021),"
        " Concentrative properties of aqueous solutions",
        "seen: a copy of the table in one public repository; the handbook was not seen",
        "uncertainty: not stated; my estimate: density 0.05 %, viscosity 1 %, index 0.0002",
        "note: 20 degC; about one row in three; g/cm3 times 1000, mPa*s over 1000",
        "note: not taken, out of line: viscosity of formic acid at 3 % (1.195 mPa*s)",
    ], handbook())  # fmt: skip
    write("ThermoMLArchive_aqueous_more", [
        "source: journal papers, DOI per row",
        "seen: rows of the NIST/TRC ThermoML archive quoted in the data files of one public"
        " repository; the papers themselves were not seen",
        "uncertainty: not carried there; the scatter between papers is the practical measure",
        "note: about 101 kPa; a mole fraction of water became 1 - x",
    ], archive())  # fmt: skip
    write("Rafati2011", [
        "source: Rafati A.A., Bagheri A., Najafi M., J. Chem. Thermodyn. 43 (2011) 248-254,"
        " doi:10.1016/j.jct.2010.09.003",
        "seen: the Redlich-Kister coefficients in the tests of an open-source library and the"
        " abstract; evaluated here",
        "uncertainty: my estimate: glycol 1 mN/m, acetonitrile 3 mN/m (the polynomial swings)",
        "note: acetonitrile at mole fraction 0.9 is not taken: 24.3 mN/m, 4 below the pure liquid",
    ], rafati())  # fmt: skip
    write("HandbookRecalled", [
        "source: handbook tables of the surface tension of aqueous mixtures, as recollected",
        "seen: from memory; no copy was seen",
        "uncertainty: unknown; 5 % is assumed",
    ], (row for (key, T), text in RECALLED.items()
        for row in mass_rows(key, T, "surface_tension", text)))  # fmt: skip
    write("Vazquez1995recalled_1-propanol", [
        "source: Vazquez G., Alvarez E., Navaza J.M., J. Chem. Eng. Data 40 (1995) 611-614,"
        " doi:10.1021/je00019a016, as recollected",
        "seen: from memory; no copy of these rows was seen",
        "uncertainty: unknown; 5 % is assumed",
    ], [("1-propanol", "water", "mass", w, "298.15", "surface_tension", shifted(value, -3), "")
        for w, value in zip(
            ("0.05", "0.1", "0.2", "0.3", "0.4", "0.5", "0.6", "0.7", "0.8", "0.9"),
            VAZQUEZ_1_PROPANOL, strict=True)])  # fmt: skip
    write("Hexanediol2004fit", [
        "source: a third party's fit of the viscosities of doi:10.1515/zna-2004-0905",
        "seen: the closed fit in one open program, which cites the paper; evaluated here",
        "uncertainty: unknown; my estimate 5 %",
        "note: temperature not given; the fit starts from 1.002 mPa*s, water at 20 degC",
    ], hexanediol())  # fmt: skip
    write("AbsorberProgram", [
        "source: property functions of aqueous ethanolamine in public programs for carbon dioxide"
        " absorbers; the origin of their coefficients is not named there",
        "seen: the coefficients in two of the programs; evaluated here without carbon dioxide",
        "uncertainty: not stated; my estimate: density 0.2 %, viscosity 4 %, surface tension 4 %",
        "note: to 40 % only: above, the surface tension runs far below the pure amine's",
    ], ethanolamine())  # fmt: skip
    write("GerkeLab_propylene_glycol", [
        "source: S. J. Gerke, own measurements in a public laboratory repository",
        "seen: the data file itself",
        "uncertainty: not stated; Abbe refractometer, rotational viscometer",
        "note: the same laboratory's glycerol + water came out 5 % too thin to 12 % too thick",
    ], gerke())  # fmt: skip
    write("ASHRAE2001_propylene_glycol", [
        "source: ASHRAE Handbook of Fundamentals 2001, tables of inhibited aqueous propylene glycol",
        "seen: the equation of CoolProp 8.0.0 that was fitted to them (APG); evaluated here",
        "uncertainty: my estimate 4 %; about 0.5 % of inhibitors",
        "note: volume per cent at 20 degC became mass with 1036.1 and 998.2 kg/m3",
    ], antifreeze())  # fmt: skip


if __name__ == "__main__":
    main()
