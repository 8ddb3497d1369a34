"""Write the specs of the salts (and acids, bases, ammonia) of Laliberte's table, and of their solutions.

    python data/build/laliberte_specs.py [--show]

The coefficients, temperatures and largest mass fractions come from the table in the data files of
the library chemicals, as printed; nothing but names is typed here. What a second source says
(`CHECKED`, files in `data/published/mixtures`) decides the grade, and where the two part at high
concentration the range ends. `--show` prints those figures and writes nothing. Then run
`build.py` on the new names.

What a spec is left out for stands in `LEFT_OUT`; specs without this file's header are not touched.
"""

from __future__ import annotations

import csv
import sys
import tomllib
from collections.abc import Iterator, Mapping
from dataclasses import dataclass
from pathlib import Path
from typing import Any

import numpy as np
from record_builder.forms import Array
from record_builder.points import Published
from record_builder.solutes import SOLUTE_FORMS
from record_builder.subjects import Pure

DATA = Path(__file__).resolve().parents[1]
SPECS = DATA / "build" / "specs"
HEADER = "# Written by data/build/laliberte_specs.py; do not edit.\n"
SOURCE = "Laliberte2009"
CHECKED = ("CRCHandbook2021_concentrative", "Melinder2010_salts")
WATER = 0.018015268  # kg/mol
# Where a second source parts from the formula by more than this, the range ends.
PARTED = {"density": 0.007, "viscosity": 0.06}
LIMITS = {"density": 0.0015, "viscosity": 0.03}
# What the library's table bears (k = 1), with and without a second source.
STATED = {"density": (0.0005, 0.001), "viscosity": (0.01, 0.03)}
UNITS = {"density": "kg/m3", "viscosity": "Pa*s"}
LOWEST, HIGHEST = 273.15, 373.15  # K, where water is a liquid at ambient pressure
FEWEST, LEAST_FRACTION = 10, 0.03
LEAST_SALT = 0.001  # where a formula begins that is infinite for a pinch of salt

LEFT_OUT = {
    "Ethanol": "a liquid with records of its own",
    "Acetic Acid": "a liquid of its own",
    "Formic Acid": "a liquid of its own",
    "Hydrogen Peroxide": "a liquid of its own, and an oxidiser that decomposes",
    "Hydrogen Cyanide": "no use is made of it here",
    "Arsenious Acid": "no use is made of it here",
    "Arsenic Acid": "no use is made of it here",
    "Sodium Chloride": "its spec is written by hand",
    "Sucrose": "its spec is written by hand",
    "Potassium Carbonate": "density 0.2 to 0.8 % below, viscosity 1 to 12 % above two sources "
    "that agree with each other; its spec is fitted to those",
    "Potassium Bicarbonate": "viscosity 13 to 14 % above the second source at every fraction",
    "Dipotassium Hydrogen Phosphate": "viscosity infinite for a pinch of it; its spec is fitted "
    "to the second source",
    "aluminum sodium tetrahydroxide": "its CAS number in the table is made up",
}
# Keys, names, synonyms, families: the only things that are typed.
RENAMED = {
    "Hydrochloric Acid": ("hydrogen_chloride", "hydrogen chloride"),
    "Hydrobromic Acid": ("hydrogen_bromide", "hydrogen bromide"),
    "Aluminum Sulfate": ("aluminium_sulfate", "aluminium sulfate"),
    "Aluminum Chloride": ("aluminium_chloride", "aluminium chloride"),
    "manganese(II) sulphate": ("manganese_ii_sulfate", "manganese(II) sulfate"),
}
SYNONYMS = {
    "ammonia": ["NH3", "ammonia solution"],
    "ammonium_chloride": ["NH4Cl", "sal ammoniac"],
    "ammonium_nitrate": ["NH4NO3"],
    "ammonium_sulfate": ["(NH4)2SO4"],
    "aluminium_sulfate": ["aluminum sulfate"],
    "barium_chloride": ["BaCl2"],
    "calcium_chloride": ["CaCl2"],
    "calcium_nitrate": ["Ca(NO3)2"],
    "copper_ii_chloride": ["CuCl2", "cupric chloride"],
    "copper_ii_nitrate": ["Cu(NO3)2", "cupric nitrate", "copper nitrate"],
    "copper_ii_sulfate": ["CuSO4", "cupric sulfate", "copper sulfate"],
    "disodium_hydrogen_phosphate": ["Na2HPO4", "sodium hydrogen phosphate"],
    "hydrogen_bromide": ["HBr", "hydrobromic acid"],
    "hydrogen_chloride": ["HCl", "hydrochloric acid"],
    "iron_ii_chloride": ["FeCl2", "ferrous chloride"],
    "iron_ii_sulfate": ["FeSO4", "ferrous sulfate"],
    "iron_iii_chloride": ["FeCl3", "ferric chloride"],
    "iron_iii_sulfate": ["Fe2(SO4)3", "ferric sulfate"],
    "lithium_chloride": ["LiCl"],
    "lithium_hydroxide": ["LiOH"],
    "lithium_nitrate": ["LiNO3"],
    "lithium_sulfate": ["Li2SO4"],
    "magnesium_chloride": ["MgCl2"],
    "magnesium_nitrate": ["Mg(NO3)2"],
    "magnesium_sulfate": ["MgSO4"],
    "nickel_ii_sulfate": ["NiSO4", "nickel sulfate"],
    "nitric_acid": ["HNO3"],
    "phosphoric_acid": ["H3PO4", "orthophosphoric acid"],
    "potassium_bromide": ["KBr"],
    "potassium_chloride": ["KCl"],
    "potassium_dihydrogen_phosphate": ["KH2PO4", "monopotassium phosphate"],
    "potassium_hydroxide": ["KOH", "caustic potash"],
    "potassium_iodide": ["KI"],
    "potassium_nitrate": ["KNO3", "saltpetre", "saltpeter"],
    "potassium_sulfate": ["K2SO4"],
    "sodium_bicarbonate": ["NaHCO3", "sodium hydrogen carbonate"],
    "sodium_bromide": ["NaBr"],
    "sodium_carbonate": ["Na2CO3", "soda ash"],
    "sodium_dihydrogen_phosphate": ["NaH2PO4", "monosodium phosphate"],
    "sodium_hydroxide": ["NaOH", "caustic soda"],
    "sodium_iodide": ["NaI"],
    "sodium_nitrate": ["NaNO3"],
    "sodium_phosphate": ["Na3PO4", "trisodium phosphate"],
    "sodium_sulfate": ["Na2SO4"],
    "sodium_thiosulfate": ["Na2S2O3"],
    "strontium_chloride": ["SrCl2"],
    "sulfuric_acid": ["H2SO4", "sulphuric acid"],
    "zinc_chloride": ["ZnCl2"],
    "zinc_nitrate": ["Zn(NO3)2"],
    "zinc_sulfate": ["ZnSO4"],
}
ACIDS = {"hydrogen_bromide", "hydrogen_chloride", "nitric_acid", "phosphoric_acid", "sulfuric_acid"}
# Registry numbers that the table has as another substance's; the second source has these.
CAS = {"manganese_ii_sulfate": "7785-87-7"}
# From memory, marked so in the record; the safety data sheet comes first.
WARNINGS = {
    "cadmium": "Cadmium compounds are toxic and can cause cancer (see the safety data sheet).",
    "lead_": "Lead compounds are toxic (see the safety data sheet).",
    "chrom": "Chromates are toxic and oxidising and can cause cancer (see the safety data sheet).",
    "cobalt": "Cobalt salts are toxic and sensitising (see the safety data sheet).",
    "nickel": "Nickel salts are toxic, sensitising and can cause cancer (see the safety data sheet).",
    "barium": "Soluble barium salts are toxic (see the safety data sheet).",
    "hydroxide": "Corrosive alkali; dissolving it gives heat (see the safety data sheet).",
    "ammonia": "Gives off irritant, toxic gas (see the safety data sheet).",
    "oxalate": "Toxic if swallowed (see the safety data sheet).",
    "nitrite": "Toxic if swallowed, oxidising when dry (see the safety data sheet).",
    "nitrate": "Oxidising when dry (see the safety data sheet).",
    "chlorate": "Strongly oxidising when dry (see the safety data sheet).",
    "fluoride": "Toxic; attacks glass (see the safety data sheet).",
    "hydrogen_": "Corrosive acid, gives off corrosive gas (see the safety data sheet).",
    "_acid": "Corrosive acid; dilution gives heat (see the safety data sheet).",
}


@dataclass(frozen=True)
class Row:
    """One solute of the table; temperatures in K."""

    key: str
    name: str
    cas: str
    formula: str
    numbers: Mapping[str, Mapping[str, float]]  # density, viscosity: parameters
    ranges: Mapping[str, tuple[float, float]]
    largest: Mapping[str, float]
    points: Mapping[str, int]


def _key(name: str) -> tuple[str, str]:
    if name in RENAMED:
        return RENAMED[name]
    plain = name.replace("(", " ").replace(")", " ").lower()
    words = [word for word in name.split() if word]
    shown = " ".join(word if word.isupper() else word[0].lower() + word[1:] for word in words)
    return "_".join(plain.split()), shown


def table() -> list[Row]:
    """The rows that have density and viscosity."""
    import chemicals

    path = Path(chemicals.__file__).parent / "Electrolytes" / "Laliberte2009.tsv"
    found = []
    with path.open(encoding="utf-8") as handle:
        lines = list(csv.reader(handle, delimiter="\t"))
    for line in lines[1:]:
        if not line[4] or not line[13] or line[0] in LEFT_OUT:
            continue
        key, name = _key(line[0])
        density = {f"c{i}": float(line[4 + i]) for i in range(5)}
        viscosity = {f"v{i}": float(line[12 + i]) for i in range(1, 7)}
        ranges, largest, points = {}, {}, {}
        for prop, start in (("density", 9), ("viscosity", 19)):
            low, high, fraction, count = line[start : start + 4]
            ranges[prop] = (float(low) + 273.15, float(high) + 273.15)
            largest[prop], points[prop] = float(fraction), int(count)
        cas = CAS.get(key, line[1].strip())
        numbers = {"density": density, "viscosity": viscosity}
        found.append(Row(key, name, cas, line[2], numbers, ranges, largest, points))
    return found


def wanted(row: Row) -> str:
    """An empty text, or why a row is passed over."""
    for prop in ("density", "viscosity"):
        if row.points[prop] < FEWEST:
            return f"{prop} rests on {row.points[prop]} points"
        if row.largest[prop] < LEAST_FRACTION:
            return f"{prop} ends at {row.largest[prop]:.3g} by mass"
        low, high = span(row, prop)
        if low >= high:
            return f"no temperature between {LOWEST} and {HIGHEST} K"
    return ""


def span(row: Row, prop: str) -> tuple[float, float]:
    """Range of a block: that of the table, within liquid water; 1 K about a single temperature."""
    low, high = max(row.ranges[prop][0], LOWEST), min(row.ranges[prop][1], HIGHEST)
    if high - low < 2.0:
        middle = 0.5 * (low + high)
        low, high = middle - 1.0, middle + 1.0
    return round(low, 2), round(high, 2)


def molar_mass(formula: str) -> float:
    """From the formula, with standard atomic weights [kg/mol]."""
    from chemicals.elements import molecular_weight, nested_formula_parser

    return float(f"{molecular_weight(nested_formula_parser(formula)) / 1000.0:.7g}")


class Compared:
    """A row beside its second source."""

    def __init__(self, row: Row, prop: str, published: Published, water: Pure) -> None:
        self.row, self.prop = row, prop
        self.mass = molar_mass(row.formula)
        names = sorted((row.key, "water"))
        self.names = (names[0], names[1])
        self.second_is_solute = names[1] == row.key
        masses = (self.mass, WATER) if not self.second_is_solute else (WATER, self.mass)
        self.low, self.high = span(row, prop)
        self.water, self.form = water, f"laliberte_{prop}"
        self.files: list[str] = []
        self.points: list[tuple[float, float, float, float]] = []  # T, w, value, relative
        for file in CHECKED:
            seen = published.read(f"mixtures/{file}", prop, self.names, masses)
            if seen:
                self.files.append(f"mixtures/{file}")
            for point in seen:
                w = 1.0 - point.fraction if self.second_is_solute else point.fraction
                value = self.value(point.temperature, w)
                self.points.append((point.temperature, w, point.value, value / point.value - 1.0))
        self._lower_to_20()
        self.physical = self._physical()
        held = [p for p in self.points if self.low - 0.01 <= p[0] <= self.high + 0.01]
        self.end = self._end([p for p in held if p[1] <= row.largest[prop] + 1e-9])
        self.end = min(self.end, self.cut)
        self.held = [p for p in held if p[1] <= self.end + 1e-9]

    def value(self, T: float, w: float) -> float:
        """By the published formula on the record of water."""
        t, x = np.array([T]), np.array([w])
        solvent = self.water.value(self.prop, t)
        numbers = self.row.numbers[self.prop]
        return float(SOLUTE_FORMS[self.form](numbers, t, x, solvent, (self.mass, WATER))[0])

    def _physical(self) -> str:
        """Ends the range where the formula would rise with temperature; an empty text if it holds.

        Water's own density maximum apart. A pinch of salt that changes a value by more than
        2 % means that the formula was not fitted to dilute solutions.
        """
        self.risen, self.start, self.cut = "", 0.0, 1.0
        floor = 277.6 if self.prop == "density" else 0.0
        T = np.linspace(self.low, self.high, 401)
        values = self._grid(T, 1e-6)
        if not np.isfinite(values).all():
            self.start = LEAST_SALT
            values = self._grid(T, self.start)
        with np.errstate(all="ignore"):
            middle = float(self.water.value(self.prop, T)[200])
            pinch = self.value(float(T[200]), 0.002) / middle - 1.0
        if not (np.isfinite(values).all() and (values > 0).all()):
            return "the formula has no value at some fractions"
        if abs(pinch) > 0.02:
            return f"0.2 % by mass changes the {self.prop} by {100 * pinch:.1f} %"
        wrong = (np.diff(values, axis=1) >= 0.0) & (T[1:] > floor)
        if not wrong.any():
            return ""
        return self._cut(T, np.linspace(self.start, self.row.largest[self.prop], 41), wrong)

    def _cut(self, T: Array, w: Array, wrong: Any) -> str:
        """Keep the largest block of temperatures (20 and 25 degC in it) and fractions that falls."""
        best = (0.0, 0, 0, 0)
        for i in range(0, 400, 4):
            if T[i] > max(self.low, 293.15):
                break
            for j in range(400, i, -4):
                if T[j] < min(self.high, 298.15):
                    break
                rows = wrong[:, i:j].any(axis=1)
                last = int(np.argmax(rows)) - 1 if rows.any() else len(w) - 1
                if last > 0:
                    best = max(best, (float((T[j] - T[i]) * w[last]), i, j, last))
        area, i, j, last = best
        if area < 0.4 * (self.high - self.low) * w[-1]:
            return "the formula rises with temperature in most of its range"
        self.low, self.high = round(float(T[i]), 2), round(float(T[j]), 2)
        self.cut = float(np.floor(1000.0 * w[last]) / 1000.0)
        self.risen = "cut where the formula would rise with temperature"
        return ""

    def _grid(self, T: Array, start: float) -> Array:
        """Values over temperatures (columns) and fractions from `start` on (rows)."""
        w = np.linspace(start, self.row.largest[self.prop], 41)
        grid_T, grid_w = (grid.ravel() for grid in np.meshgrid(T, w))
        solvent = self.water.value(self.prop, grid_T)
        numbers = self.row.numbers[self.prop]
        with np.errstate(all="ignore"):
            flat = SOLUTE_FORMS[self.form](numbers, grid_T, grid_w, solvent, (self.mass, WATER))
        return np.asarray(flat.reshape(len(w), len(T)))

    def _lower_to_20(self) -> None:
        """A table that begins at 25 degC serves at 20 degC where the second source agrees there."""
        self.lowered = False
        if not 293.16 < self.low <= 298.2:
            return
        here = [p for p in self.points if p[0] == 293.15 and p[1] <= self.row.largest[self.prop]]
        if here and max(abs(p[3]) for p in here) <= LIMITS[self.prop]:
            self.low, self.lowered = 293.15, True

    def _end(self, points: list[tuple[float, float, float, float]]) -> float:
        """Largest mass fraction: that of the table, or where the second source parts from it."""
        largest = self.row.largest[self.prop]
        whole = float(np.floor(1000.0 * largest) / 1000.0)
        by_fraction = sorted({p[1] for p in points})
        good = [
            w
            for w in by_fraction
            if np.median([abs(p[3]) for p in points if p[1] == w]) <= PARTED[self.prop]
        ]
        self.parted = ""
        if not good or not by_fraction or good[-1] == by_fraction[-1]:
            return whole
        beyond = max((p for p in points if p[1] > good[-1]), key=lambda p: abs(p[3]))
        self.parted = (
            f"the formula is {100 * beyond[3]:+.1f} % from the second source at "
            f"{100 * beyond[1]:.3g} % by mass, so the range ends before; the table goes to {whole}"
        )
        return round(good[-1], 4)

    @property
    def median(self) -> float:
        """Median of the deviations inside the range."""
        return float(np.median([abs(p[3]) for p in self.held])) if self.held else float("nan")


def _sorted_warnings(row: Row) -> list[str]:
    return [text for part, text in WARNINGS.items() if part in row.key][:1]


def liquid(row: Row) -> str:
    """Spec of the solute."""
    family = "acid" if row.key in ACIDS else "amine" if row.key == "ammonia" else "salt"
    names = ", ".join(f'"{name}"' for name in SYNONYMS.get(row.key, []))
    lines = [
        f'name = "{row.name}"',
        f'cas = "{row.cas}"',
        f'formula = "{row.formula}"',
        f'family = "{family}"',
        'kind = "solute"',
        "amphiphile = false",
        f"synonyms = [{names}]",
        "cautions = []",
        "",
        "[molar_mass]",
        f"value = {molar_mass(row.formula)}",
        'source = "AtomicWeights"',
        'place = "from the formula"',
    ]
    notes = _sorted_warnings(row)
    if notes:
        lines += ["", "[hazards]", 'source = "FromMemory"', f'notes = ["{notes[0]}"]']
    return HEADER + "\n".join(lines) + "\n"


def _block(compared: Compared) -> Iterator[str]:
    row, prop = compared.row, compared.prop
    numbers = ", ".join(f"{name} = {value!r}" for name, value in row.numbers[prop].items())
    yield f"[[{prop}]]"
    yield f'form = "{compared.form}"'
    yield f"published = {{ {numbers} }}"
    yield f"range = [{compared.low}, {compared.high}]"
    low, high = compared.start, compared.end
    if compared.second_is_solute:
        low, high = round(1.0 - high, 4), 1.0 - low
    yield f"fraction_range = [{low}, {high}]"
    yield f'sources = ["{SOURCE}"]'
    kelvin = [f"{t - 273.15:.4g}" for t in row.ranges[prop]]
    yield f'place = "row of {row.cas}; {row.points[prop]} points, {kelvin[0]} to {kelvin[1]} degC"'
    notes = [text for text in (compared.parted, compared.risen) if text]
    if compared.start:
        notes.append("from 0.1 % by mass: the formula is infinite for a pinch of it")
    if compared.lowered:
        notes.append(
            f"from 20 degC, where the second source agrees ({100 * compared.median:.2g} %)"
        )
    with_second, alone = STATED[prop]
    if compared.held:
        files = ", ".join(f'{{ file = "{file}" }}' for file in compared.files)
        yield f"second = [{files}]"
        yield f"source_uncertainty = {with_second}"
        if compared.median > LIMITS[prop]:
            yield "single = true"
            yield (
                f'single_reason = "the second source differs by {100 * compared.median:.2g} % '
                'in the median"'
            )
    else:
        yield f"source_uncertainty = {alone}"
        yield "single = true"
        yield 'single_reason = "no second source was seen"'
        T, w = round(0.5 * (compared.low + compared.high), 2), float(f"{0.5 * compared.end:.2g}")
        fraction = round(1.0 - w, 4) if compared.second_is_solute else w
        value = independent(row, prop, T, w)
        yield (
            f'checks = [{{ T = {T}, fraction = {fraction}, value = {value:.6g}, source = "{SOURCE}", '
            'place = "the row evaluated by the library thermo: tests the equation, not the data", '
            f"tolerance = {2 * alone:g} }}]"
        )
    if notes:
        yield f'note = "{"; ".join(notes)}"'


def independent(row: Row, prop: str, T: float, w: float) -> float:
    """The same row by thermo's own function, its own water included."""
    from thermo import electrochem

    numbers = [[value] for value in row.numbers[prop].values()]
    function = getattr(electrochem, f"Laliberte_{prop}_mix")
    return float(function(T, [w], *numbers))


def main(arguments: list[str]) -> int:
    """Write the specs, or show how the rows compare."""
    published = Published(DATA / "published")
    water = Pure.load(DATA / "liquids", "water")
    written = []
    for row in sorted(table(), key=lambda row: row.key):
        why = wanted(row)
        if why:
            print(f"{row.key}: passed over: {why}")
            continue
        both = [Compared(row, prop, published, water) for prop in ("density", "viscosity")]
        faults = [f"{one.prop}: {one.physical}" for one in both if one.physical]
        if faults:
            print(f"{row.key}: passed over: {'; '.join(faults)}")
            continue
        for one in both:
            print(
                f"{row.key} {one.prop}: {one.low} to {one.high} K, w to {one.end}, "
                f"{len(one.held)} points, median {100 * one.median:.3g} % {one.parted}"
            )
        if "--show" in arguments:
            continue
        pair = "__".join(both[0].names)
        components = ", ".join(f'"{name}"' for name in both[0].names)
        blocks = [f"components = [{components}]"]
        for one in both:
            blocks += ["", *_block(one)]
        blocks += ["", extra] if (extra := _extra(row.key)) else []
        targets = {
            SPECS / "liquids" / f"{row.key}.toml": liquid(row),
            SPECS / "mixtures" / f"{pair}.toml": HEADER + "\n".join(blocks) + "\n",
        }
        for path, text in targets.items():
            if path.exists() and not path.read_text(encoding="utf-8").startswith(HEADER):
                print(f"{path.name}: written by hand, left alone")
                continue
            tomllib.loads(text)
            path.write_text(text, encoding="utf-8")
        written += [row.key, pair]
    print(" ".join(written))
    return 0


def _extra(key: str) -> str:
    """Blocks of a pair that come from elsewhere, kept beside this file."""
    path = SPECS / "salts_surface_tension.toml"
    if not path.exists():
        return ""
    with path.open("rb") as handle:
        blocks: dict[str, Any] = tomllib.load(handle)
    if key not in blocks:
        return ""
    text = path.read_text(encoding="utf-8")
    start = text.index(f"[{key}]") + len(key) + 2
    rest = text[start:]
    stop = rest.find("\n[")
    return "[[surface_tension]]" + (rest if stop < 0 else rest[:stop]).rstrip()


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
