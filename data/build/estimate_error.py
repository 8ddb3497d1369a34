"""How wrong is a mixture estimated without a fitted pair? Measured on published pairs.

    python data/build/estimate_error.py FOLDER

FOLDER holds reference CSVs of binary mixtures and pure liquids (`# source:` first, then a header).
Every pair counts as hidden: its own points never enter the estimate, only measured pure ends do.
The rules are those of the mixture records without their excess: density by ideal specific
volume in mass fractions; viscosity and surface tension by the logarithm in volume fractions;
refractive index linear in volume fractions; volumes with the pure densities at 293.15 K.
Writes `data/mixtures-estimates.toml`.
"""

from __future__ import annotations

import csv
import sys
from collections import defaultdict
from collections.abc import Iterable, Iterator
from dataclasses import dataclass, field
from itertools import pairwise
from pathlib import Path
from statistics import median
from typing import Any, TypeAlias

import numpy as np
from record_builder.statistics import round_up
from record_builder.toml_out import dumps

from dropkit.properties.mixing.estimates import share_factor

TARGET = Path(__file__).resolve().parents[1] / "mixtures-estimates.toml"
PROPERTIES = {
    "density_kg_m3": "density",
    "viscosity_Pa_s": "viscosity",
    "surface_tension_N_m": "surface_tension",
    "surface_tension_pendant_N_m": "surface_tension",
    "refractive_index_nD": "refractive_index",
}
RULES = {
    "density": "ideal specific volume in mass fractions",
    "viscosity": "logarithm in volume fractions, no excess",
    "surface_tension": "logarithm in volume fractions, no excess",
    "refractive_index": "linear in volume fractions, no excess",
}
# Other spellings in headers and file names; "" means: not a pair that is estimated this way
# (a dissolved solid, an open origin or a table that repeats another).
SPELLINGS = {
    "dmso": "dimethyl sulfoxide",
    "dmf": "N,N-dimethylformamide",
    "propane-1-3-diol": "1,3-propanediol",
    "1_2_hexanediol": "1,2-hexanediol",
    "1-2-hexanediol": "1,2-hexanediol",
    "NaCl": "",
    "salt": "",
    "sucrose": "",
    "alcohol": "",
}
# Their surface tension in water is refused, not estimated, so it says nothing about estimates.
AMPHIPHILES = {
    *("1-propanol", "2-propanol", "1-butanol", "2-butanol", "1-pentanol", "1-octanol"),
    *("1,2-hexanediol", "2-methoxyethanol", "2-ethoxyethanol", "2-butoxyethanol"),
}
# Files that repeat another file or that the reference folder itself warns of.
PASSED_OVER = {"propylene_glycol_water_khattab_2017", "interfacial_tension_water_web"}
# Evaluated handbook equations and saturation tables: not the measured ends that are wanted.
EQUATIONS = ("handbooks", "correlations", "vdi", "formulations", "permittivity", "conductivity")
INSIDE = (0.02, 0.98)  # mass fractions: at the ends any rule is right
# Edges of the smaller fraction of a pair, on the rule's basis, for coverage by share.
SHARES = (0.0, 0.05, 0.1, 0.2, 0.35, 0.51)
NEAR = 12.0  # K between two pure values that may be interpolated


Error: TypeAlias = "tuple[float, float]"


@dataclass(frozen=True)
class Row:
    """One mixture value; `fraction` is that of `first`, in `basis`."""

    first: str
    second: str
    basis: str
    fraction: float
    temperature: float
    property: str
    value: float
    source: str
    file: str


@dataclass
class Pures:
    """Measured values of pure liquids, and what is needed to change the basis."""

    values: dict[tuple[str, str], dict[float, list[float]]] = field(
        default_factory=lambda: defaultdict(lambda: defaultdict(list))
    )
    cas: dict[str, str] = field(default_factory=dict)
    masses: dict[str, float] = field(default_factory=dict)

    def add(self, name: str, prop: str, temperature: float, value: float) -> None:
        self.values[name, prop][round(temperature, 1)].append(value)

    def value(self, name: str, prop: str, temperature: float) -> float | None:
        """Median at that temperature, or between two temperatures close by (logarithm)."""
        table = self.values.get((name, prop))
        if not table:
            return None
        wanted = round(temperature, 1)
        if wanted in table:
            return float(median(table[wanted]))
        below = max((t for t in table if t < wanted), default=None)
        above = min((t for t in table if t > wanted), default=None)
        if below is None or above is None or above - below > NEAR:
            return None
        share = (wanted - below) / (above - below)
        low, high = median(table[below]), median(table[above])
        return float(np.exp((1 - share) * np.log(low) + share * np.log(high)))

    def density(self, name: str) -> float | None:
        """At 293.15 K, or as near to it as was measured, moved by 0.1 % per kelvin."""
        table = self.values.get((name, "density"))
        if not table:
            return None
        exact = self.value(name, "density", 293.15)
        if exact is not None:
            return exact
        near = min(table, key=lambda t: abs(t - 293.15))
        return float(median(table[near]) * (1 + 1e-3 * (near - 293.15)))

    def molar_mass(self, name: str) -> float:
        """From the CAS number, where the folder gives one, else by name."""
        if name not in self.masses:
            from chemicals import MW, CAS_from_any

            self.masses[name] = float(MW(self.cas.get(name) or CAS_from_any(name)))
        return self.masses[name]


def table(path: Path) -> Iterator[dict[str, str]]:
    """Rows of a reference file."""
    with path.open(encoding="utf-8", newline="") as handle:
        yield from csv.DictReader(line for line in handle if not line.startswith("#"))


def source_line(path: Path) -> str:
    """What the file says of its origin."""
    first = path.read_text(encoding="utf-8").splitlines()[0]
    return first.removeprefix("# source:").strip()


def spelled(name: str) -> str:
    """The name used here; empty for what is passed over."""
    plain = name.split(" (")[0]
    return SPELLINGS.get(plain, plain.replace("_", " "))


def two_substances(path: Path) -> Iterator[Row]:
    """Files that name both substances in every row."""
    for row in table(path):
        if row.get("flag"):
            continue
        first, second = spelled(row["substance_1"]), spelled(row["substance_2"])
        if "composition_type" in row:
            basis = row["composition_type"].removesuffix("_fraction")
            fraction = row["composition_of_substance_1"]
        else:
            basis, fraction = "mole", row["mole_fraction_substance_1"]
        if basis not in ("mole", "mass") or not fraction:
            continue
        quantities = [row["quantity"]] if "quantity" in row else [c for c in PROPERTIES if c in row]
        for quantity in quantities:
            text = row.get("value") or row.get(quantity) or ""
            if quantity not in PROPERTIES or not text:
                continue
            yield Row(
                *(first, second, basis, float(fraction), float(row["T_K"])),
                *(PROPERTIES[quantity], float(text)),
                *(row.get("reference") or row.get("doi") or path.stem, path.stem),
            )


def one_of_water(path: Path) -> Iterator[Row]:
    """Files of one substance in water, named in the header of the composition column."""
    for row in table(path):
        if row.get("flag"):
            continue
        columns = [c for c in row if c.startswith(("mass_fraction_", "mole_fraction_"))]
        open_column = next((c for c in row if c.startswith("composition_of_")), None)
        if columns:
            column = columns[0]
            basis, name = column.split("_fraction_")
            text = row[column]
        elif open_column:
            name = open_column.removeprefix("composition_of_")
            basis, text = row["composition_type"].removesuffix("_fraction"), row[open_column]
        else:
            return
        if basis not in ("mole", "mass") or not text:
            continue
        fraction = float(text)
        if name == "water":
            # The other component stands in the file's name.
            name, fraction = path.stem.split("_water")[0], 1.0 - fraction
        if name == "alcohol" and "alcohol" in row:
            name = row["alcohol"]
        substance = spelled(name)
        if not substance or "T_K" not in row:
            continue
        for quantity, prop in PROPERTIES.items():
            if row.get(quantity):
                yield Row(
                    *(substance, "water", basis, fraction, float(row["T_K"]), prop),
                    *(float(row[quantity]), row.get("doi") or path.stem, path.stem),
                )


def binary_name(path: Path) -> Iterator[Row]:
    """Files of two organic liquids, `<a>_<b>_surface_tension_...`, first one in the header."""
    first, second = path.stem.split("_")[:2]
    for row in table(path):
        fraction = row.get(f"mole_fraction_{first}")
        if fraction and row.get("surface_tension_N_m"):
            value = float(row["surface_tension_N_m"])
            yield Row(
                *(first, second, "mole", float(fraction), float(row["T_K"])),
                *("surface_tension", value, path.stem, path.stem),
            )


def read_pures(folder: Path) -> Pures:
    """Pure liquids of the folder."""
    pures = Pures()
    for path in sorted(folder.glob("pure_*.csv")):
        for row in table(path):
            if "substance" not in row or row.get("flag") or row.get("T_K") == "":
                continue
            name = spelled(row["substance"])
            if row.get("cas"):
                pures.cas[name] = row["cas"]
            if "sigma_at_0C_N_m" in row:
                for t in np.arange(273.15, 374.0, 5.0):
                    if float(row["T_min_K"]) - 5 <= t <= float(row["T_max_K"]) + 5:
                        slope = float(row["dsigma_dT_N_m_K"]) * (t - 273.15)
                        value = float(row["sigma_at_0C_N_m"]) + slope
                        pures.add(name, "surface_tension", t, value)
                continue
            if any(word in path.stem for word in EQUATIONS):
                continue
            quantity = row.get("quantity")
            columns = [quantity] if quantity else [c for c in PROPERTIES if c in row]
            for column in columns:
                text = row.get("value") if quantity else row.get(column)
                if column in PROPERTIES and text:
                    pures.add(name, PROPERTIES[column], float(row["T_K"]), float(text))
    for key in [key for key in pures.values if key[0] == "water"]:
        del pures.values[key]
    for row in table(folder / "water_iapws.csv"):
        for column, prop in PROPERTIES.items():
            if row.get(column):
                pures.add("water", prop, float(row["T_K"]), float(row[column]))
    for t, n in ((293.15, 1.33299), (298.15, 1.33250)):  # ICUMSA 1974; IAPWS R9-97 against air
        pures.add("water", "refractive_index", t, n)
    return pures


def read_mixtures(folder: Path) -> list[Row]:
    """Every binary mixture of the folder that the rules apply to."""
    rows: list[Row] = []
    for path in sorted(folder.glob("*.csv")):
        if path.stem.startswith("pure_") or path.stem in PASSED_OVER:
            continue
        if path.stem.startswith("FROM_MEMORY") and "vazquez" not in path.stem:
            continue
        header = next(iter(table(path)), {})
        if "substance_1" in header:
            rows += two_substances(path)
        elif "_water" in path.stem:
            rows += one_of_water(path)
        elif "_surface_tension_" in path.stem:
            rows += binary_name(path)
    return rows


def mass_fraction(row: Row, pures: Pures) -> float:
    """Of the first substance."""
    if row.basis == "mass":
        return row.fraction
    first = row.fraction * pures.molar_mass(row.first)
    return first / (first + (1.0 - row.fraction) * pures.molar_mass(row.second))


def estimate(
    prop: str, w: float, ends: tuple[float, float], densities: tuple[float, float]
) -> float:
    """The value without excess."""
    if prop == "density":
        return 1.0 / (w / ends[0] + (1.0 - w) / ends[1])
    first = w / densities[0]
    phi = first / (first + (1.0 - w) / densities[1])
    if prop == "refractive_index":
        return phi * ends[0] + (1.0 - phi) * ends[1]
    return float(np.exp(phi * np.log(ends[0]) + (1.0 - phi) * np.log(ends[1])))


def own_ends(rows: Iterable[Row]) -> dict[tuple[str, str, str, float], float]:
    """Pure ends measured in the same source: (source, substance, property, T) -> value."""
    found: dict[tuple[str, str, str, float], float] = {}
    for row in rows:
        for name, is_end in ((row.first, row.fraction == 1.0), (row.second, row.fraction == 0.0)):
            if is_end:
                found[row.source, name, row.property, round(row.temperature, 1)] = row.value
    return found


def errors(
    rows: list[Row], pures: Pures
) -> tuple[dict[str, dict[str, dict[str, list[Error]]]], dict[str, set[str]], int]:
    """Errors with the smaller share, by property, water or not, and pair; files; rows passed over.

    An error is counted as the estimate's band is: (measured - estimate) / estimate.
    """
    own = own_ends(rows)
    for (_, name, prop, temperature), value in own.items():
        if name != "water":
            pures.add(name, prop, temperature, value)
    found: dict[str, dict[str, dict[str, list[Error]]]] = defaultdict(
        lambda: defaultdict(lambda: defaultdict(list))
    )
    files: dict[str, set[str]] = defaultdict(set)
    passed = 0
    for row in rows:
        watery = "water" in (row.first, row.second)
        other = row.first if row.second == "water" else row.second
        if row.property == "surface_tension" and watery and other in AMPHIPHILES:
            continue
        w = mass_fraction(row, pures)
        if not INSIDE[0] <= w <= INSIDE[1]:
            continue
        names = (row.first, row.second)
        at = round(row.temperature, 1)
        ends = [
            own.get((row.source, name, row.property, at))
            or pures.value(name, row.property, row.temperature)
            for name in names
        ]
        densities = [pures.density(name) for name in names]
        if None in ends or None in densities:
            passed += 1
            continue
        guess = estimate(
            row.property,
            w,
            (float(ends[0] or 0), float(ends[1] or 0)),
            (float(densities[0] or 0), float(densities[1] or 0)),
        )
        group = "with_water" if watery else "without_water"
        share = w
        if row.property != "density":
            first = w / float(densities[0] or 0)
            share = first / (first + (1.0 - w) / float(densities[1] or 0))
        error = (row.value / guess - 1.0, min(share, 1.0 - share))
        found[row.property][group][" + ".join(sorted(names))].append(error)
        files[row.property].add(row.file)
    return found, files, passed


def figures(pairs: dict[str, list[Error]]) -> dict[str, Any]:
    """The error over all points, and with every pair counting the same; the larger is used."""
    points, shares_of = np.concatenate([np.array(values) for values in pairs.values()]).T
    weights = np.concatenate([np.full(len(v), 1.0 / len(v)) for v in pairs.values()])
    rms = float(np.sqrt(np.mean(points**2)))
    rms_pairs = float(np.sqrt(np.average(points**2, weights=weights)))
    band = float(np.quantile(np.abs(points), 0.9, method="higher"))
    order = np.argsort(np.abs(points))
    shares = np.cumsum(weights[order]) / weights.sum()
    band_pairs = float(np.abs(points)[order][np.searchsorted(shares, 0.9)])
    # k = 1: the rms error, or what makes twice it, by the share of the two, cover 90 % of the
    # hidden points in every stretch of shares.
    factor = share_factor(shares_of, 1.0 - shares_of)
    stretches = {}
    for low, high in pairwise(SHARES):
        here = (shares_of >= low) & (shares_of < high)
        if here.sum() >= 10:
            stretches[f"{low:g} to {min(high, 0.5):g}"] = here
    scaled = np.abs(points) / factor
    groups = [scaled, *(scaled[here] for here in stretches.values())]
    needed = [np.quantile(group, 0.9, method="higher") for group in groups]
    halves = [0.5 * float(value) for value in (band, band_pairs, *needed)]
    uncertainty = round_up(max(rms, rms_pairs, *halves) * (1.0 + 1e-9), 3)
    inside = np.abs(points) <= 2 * uncertainty * factor
    covered = float(np.mean(inside))
    by_share = {name: float(f"{np.mean(inside[here]):.3g}") for name, here in stretches.items()}
    if min([covered, *by_share.values()]) < 0.9:
        raise SystemExit(f"band covers only {min([covered, *by_share.values()]):.0%}")
    return {
        "uncertainty": uncertainty,
        "rms": float(f"{rms:.3g}"),
        "rms_pairs_alike": float(f"{rms_pairs:.3g}"),
        "band_90": float(f"{band:.3g}"),
        "band_90_pairs_alike": float(f"{band_pairs:.3g}"),
        "bias": float(f"{points.mean():.3g}"),
        "worst": float(f"{np.abs(points).max():.3g}"),
        "covered": float(f"{covered:.3g}"),
        "covered_by_share": by_share,
        "pairs": len(pairs),
        "points": len(points),
    }


def main(folder: Path, target: Path = TARGET) -> dict[str, Any]:
    """Measure, print and write."""
    pures = read_pures(folder)
    found, files, passed = errors(read_mixtures(folder), pures)
    result: dict[str, Any] = {}
    for prop, rule in RULES.items():
        result[prop] = {"rule": rule, "files": sorted(files[prop])}
        for group in ("with_water", "without_water"):
            pairs = found[prop].get(group)
            if pairs:
                result[prop][group] = figures(pairs)
        if "without_water" not in result[prop]:
            result[prop]["without_water"] = result[prop]["with_water"] | {
                "note": "no pair without water was seen; the aqueous figures stand in"
            }
    used = sorted(set().union(*files.values()))
    result["sources"] = {stem: source_line(folder / f"{stem}.csv") for stem in used}
    header = (
        "Written by data/build/estimate_error.py. Errors, (measured - estimate) / estimate, of\n"
        "mixtures estimated without a fitted pair: published pairs of which nothing but the pure\n"
        "ends entered.\n"
        "uncertainty is k = 1: twice it covers at least 90 % of the hidden points.\n"
        f"{passed} points were passed over because a pure end was not measured close by."
    )
    target.write_text(dumps(result, header), encoding="utf-8")
    for prop in RULES:
        for group in ("with_water", "without_water"):
            print(prop, group, {k: v for k, v in result[prop][group].items() if k != "note"})
            for pair, values in sorted(found[prop].get(group, {}).items()):
                a = np.array(values)[:, 0]
                print(f"    {pair}: {len(a)} points, rms {np.sqrt(np.mean(a**2)):.4f}")
    print(f"passed over: {passed}")
    return result


if __name__ == "__main__":
    main(Path(sys.argv[1]))
