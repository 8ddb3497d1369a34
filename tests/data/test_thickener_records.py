"""Records of thickeners: format, points, fits, checks, and the page that lists them."""

from __future__ import annotations

import csv
import math
import re
from pathlib import Path
from typing import Any

import numpy as np
import pytest
from scipy.optimize import least_squares

from dropkit import records
from dropkit.errors import RecordError
from dropkit.properties.polymer_laws import entry_chain
from dropkit.record_rules import problems
from dropkit.record_store import Store, parse_file, seal_of
from dropkit.record_thickeners import read_thickener

ROOT = records.data_dir()
STORE = Store(str(ROOT))
KEYS = sorted(STORE.stems("thickeners"))
FILES = sorted(path.stem for path in (ROOT / "published" / "thickeners").glob("*.csv"))
PAGE = Path(__file__).parents[2] / "docs" / "thickeners.md"
COLUMNS = [
    *("thickener", "molar_mass_kg_per_mol", "salt", "salt_mol_per_m3", "T_K"),
    *("concentration_kg_per_m3", "specific_viscosity"),
]


def lines(name: str) -> list[str]:
    path = ROOT / "published" / "thickeners" / f"{name}.csv"
    return path.read_text(encoding="utf-8").splitlines()


def rows(name: str) -> list[dict[str, str]]:
    return list(csv.DictReader(line for line in lines(name) if not line.startswith("#")))


def points(name: str, thickener: str, mass: float, salt: float) -> tuple[np.ndarray, np.ndarray]:
    """Concentration [kg/m3] and specific viscosity of one material."""
    found = [
        (float(row["concentration_kg_per_m3"]), float(row["specific_viscosity"]))
        for row in rows(name)
        if row["thickener"] == thickener
        and math.isclose(float(row["molar_mass_kg_per_mol"]), mass, rel_tol=1e-2)
        and math.isclose(float(row["salt_mol_per_m3"]), salt, abs_tol=1e-6)
    ]
    c, sp = np.array(found).T
    return c, sp


def entries() -> list[tuple[str, int]]:
    return [
        (key, number)
        for key in KEYS
        for number in range(len(STORE.thickener(key).properties["intrinsic_viscosity"]))
    ]


ENTRIES = entries()
CASES = pytest.mark.parametrize(("key", "number"), ENTRIES)
SAMPLES = pytest.mark.parametrize(
    ("key", "number"),
    [
        (key, number)
        for key, number in ENTRIES
        if STORE.thickener(key).properties["intrinsic_viscosity"][number].form == "sample"
    ],
)


def entry_of(key: str, number: int) -> Any:
    return STORE.thickener(key).properties["intrinsic_viscosity"][number]


@pytest.mark.parametrize("key", KEYS)
def test_the_file_is_sealed_and_rests_on_what_exists(key: str) -> None:
    data = parse_file(str(ROOT), f"thickeners/{key}.toml")
    assert data["seal"] == seal_of(data)
    assert problems(STORE, read_thickener(key, data)) == []
    assert key == key.lower()


def test_names_are_used_once() -> None:
    names = [
        records.fold(word)
        for key in KEYS
        for word in {key, *STORE.thickener(key).synonyms, STORE.thickener(key).name}
    ]
    folded = [name for key in KEYS for name in {records.fold(key)}]
    assert len(set(folded)) == len(KEYS)
    for name in set(names):
        owners = {
            key
            for key in KEYS
            for word in (key, STORE.thickener(key).name, *STORE.thickener(key).synonyms)
            if records.fold(word) == name
        }
        assert len(owners) == 1, (name, owners)


@CASES
def test_the_law_gives_its_check_points(key: str, number: int) -> None:
    entry = entry_of(key, number)
    for check in entry.checks:
        chain = entry_chain(entry, check["molar_mass"], check["salt"], check.get("intrinsic"))
        got = float(chain.relative(check["concentration"], check["T"]))
        assert got == pytest.approx(check["value"], rel=check["tolerance"]), check
        # No laxer than what the entry says of itself: two standard uncertainties.
        steep = float(chain.steepness(check["concentration"], check["T"]))
        law = entry.parameters["law_uncertainty"]
        fitted = entry.form == "sample" or "intrinsic" in check
        allowed = 2.0 * (law if fitted else math.hypot(law, steep * entry.uncertainty))
        assert check["tolerance"] <= allowed


@SAMPLES
def test_published_points_lie_within_the_law(key: str, number: int) -> None:
    """Of the material that a sample entry was fitted to; 95 % of all points within two u."""
    entry = entry_of(key, number)
    off = []
    for salt in entry.parameters["salt_concentration"]:
        chain = entry_chain(entry, None, salt, None)
        for name in entry.points:
            c, sp = points(name.split("/")[1], key, entry.checks[0]["molar_mass"], salt)
            inside = c * chain.intrinsic <= 1.02 * chain.limit
            off += [
                math.log(chain.relative(float(one), 293.0) / (1.0 + float(found)))
                for one, found in zip(c[inside], sp[inside], strict=True)
            ]
    assert len(off) >= 4
    within = np.abs(off) <= 2.0 * entry.parameters["law_uncertainty"]
    assert within.mean() >= 0.95, np.round(off, 3)


def fit(c: np.ndarray, sp: np.ndarray) -> tuple[float, float]:
    """Intrinsic viscosity and Martin's constant by least squares in the relative viscosity."""

    def off(p: np.ndarray) -> np.ndarray:
        x = p[0] * c
        return np.asarray(np.log1p(x * np.exp(p[1] * x)) - np.log1p(sp))

    found = least_squares(off, [0.8 * sp[0] / c[0], 0.3], xtol=1e-14, ftol=1e-14).x
    return float(found[0]), float(found[1])


@SAMPLES
def test_samples_are_the_fit_to_their_points(key: str, number: int) -> None:
    entry = entry_of(key, number)
    p = entry.parameters
    total = 0
    for place, salt in enumerate(p["salt_concentration"]):
        c, sp = points(entry.points[0].split("/")[1], key, entry.checks[0]["molar_mass"], salt)
        # The limit is c[eta] of the last point that was fitted, to two figures downwards.
        used = c * p["values"][place] <= 1.1 * p["limits"][place]
        eta, constant = fit(c[used], sp[used])
        total += int(used.sum())
        assert p["values"][place] == pytest.approx(eta, rel=1e-3), salt
        assert p["constants"][place] == pytest.approx(constant, rel=5e-3), salt
        assert p["limits"][place] <= eta * c[used][-1]
    assert entry.obtained == f"fitted here to {total} points"


def test_hydroxypropyl_cellulose_is_the_line_through_three_samples() -> None:
    entry = entry_of("hydroxypropyl_cellulose", 0)
    masses, used = (180.0, 699.9, 2500.0), (6, 6, 3)
    found = []
    for mass, count in zip(masses, used, strict=True):
        c, sp = points("SaykoEtAl2021", "hydroxypropyl_cellulose", mass, 0.0)
        found.append(fit(c[:count], sp[:count]))
    slope, level = np.polyfit(np.log(masses), np.log([eta for eta, _ in found]), 1)
    p = entry.parameters
    assert p["exponent"] == pytest.approx(slope, rel=1e-3)
    assert p["factor"] * 1e6 ** p["exponent"] == pytest.approx(
        math.exp(level) * 1e3**slope, rel=1e-3
    )
    assert p["constants"][0] == pytest.approx(np.mean([k for _, k in found]), rel=5e-3)


def test_poly_ethylene_oxide_by_nominal_molar_mass_is_the_fit_to_four_materials() -> None:
    p = entry_of("poly_ethylene_oxide", 0).parameters
    held = [
        (float(r["molar_mass_kg_per_mol"]), float(r["concentration_kg_per_m3"]),
         float(r["specific_viscosity"]))
        for name in ("SaykoEtAl2022", "DobryninEtAl2021")
        for r in rows(name)
    ]  # fmt: skip
    start = np.array([math.log(p["factor"] * 1e6 ** p["exponent"]), p["exponent"], 0.215])
    used = [
        (M, c, sp)
        for M, c, sp in held
        if math.exp(start[0] + start[1] * math.log(M / 1e3)) * c <= p["limits"][0]
    ]
    assert len(used) == 17

    def off(q: np.ndarray) -> list[float]:
        x = [math.exp(q[0] + q[1] * math.log(M / 1e3)) * c for M, c, _ in used]
        return [
            math.log1p(one * math.exp(q[2] * one)) - math.log1p(sp)
            for one, (_, _, sp) in zip(x, used, strict=True)
        ]

    found = least_squares(off, start, xtol=1e-14, ftol=1e-14).x
    assert start == pytest.approx(found, rel=5e-3)
    assert np.mean(np.abs(off(start)) <= np.full(17, 0.2)) == 1.0


@pytest.mark.parametrize("name", FILES)
def test_published_files_say_where_they_are_from(name: str) -> None:
    head = [line for line in lines(name) if line.startswith("#")]
    assert [line.split(":")[0] for line in head[:3]] == ["# source", "# seen", "# uncertainty"]
    assert name in STORE.stems("sources")
    found = rows(name)
    assert list(found[0]) == COLUMNS
    for row in found:
        assert row["thickener"] in KEYS
        values = [float(row[column]) for column in COLUMNS if column not in ("thickener", "salt")]
        assert all(math.isfinite(value) and value >= 0.0 for value in values)
        assert float(row["specific_viscosity"]) > 0.0
        assert (row["salt"] == "") == (float(row["salt_mol_per_m3"]) == 0.0)


def test_every_published_file_is_used() -> None:
    used = {name.split("/")[1] for key, n in ENTRIES for name in entry_of(key, n).points}
    assert set(FILES) == used


def test_the_page_lists_every_entry_as_the_records_have_it() -> None:
    text = PAGE.read_text(encoding="utf-8")
    table = [
        [cell.strip() for cell in line.strip("|").split("|")]
        for line in text.splitlines()
        if line.startswith("| ") and not line.startswith("| polymer")
    ]
    shown = [row for row in table if len(row) == 8]
    expected = []
    for key, number in ENTRIES:
        entry = entry_of(key, number)
        p = entry.parameters
        for place, salt in enumerate(p["salt_concentration"]):
            low, high = p["molar_mass_range"]
            eta = (
                f"{p['values'][place]:.4g}"
                if entry.form == "sample"
                else f"{p['unit'] * p['factor']:.4g} M^{p['exponent']:.3g}"
            )
            law = f"{p['law'].split('_')[0]} {p['constants'][place]:.3g}"
            expected.append(
                [
                    STORE.thickener(key).name,
                    f"{low:g} to {high:g}",
                    f"{salt:g}",
                    f"{entry.range.low - 273.15:.4g} to {entry.range.high - 273.15:.4g}",
                    eta,
                    law,
                    f"{p['limits'][place]:g}",
                    ", ".join(entry.sources),
                ]
            )
    assert shown == expected
    for key, number in ENTRIES:
        for source in entry_of(key, number).sources:
            assert re.search(rf"\b{source}\b", text)


# --- what the format refuses ------------------------------------------------------------------


def broken(**changes: Any) -> dict[str, Any]:
    data = parse_file(str(ROOT), "thickeners/sodium_alginate.toml")
    entry = {**data["intrinsic_viscosity"][0], **changes}
    entry = {key: value for key, value in entry.items() if value is not None}
    return {**data, "intrinsic_viscosity": [entry]}


@pytest.mark.parametrize(
    ("changes", "says"),
    [
        ({"salt_concentration": [0.0]}, "above zero, with its salt"),
        ({"salt_concentration": [100.0, 50.0], "values": [1.0, 2.0]}, "rising order"),
        ({"values": [0.1, 0.2]}, "list of 1 numbers"),
        ({"constants": [-0.1]}, "at least 0"),
        ({"limits": [0.0]}, "largest"),
        ({"law": "martyn"}, "martin"),
        ({"form": "power"}, "mark_houwink"),
        ({"sources": []}, "no source, no record"),
        ({"checks": []}, "has no check point"),
        ({"viscosity_per_percent": 3.0}, "is not known here"),
        ({"material": None}, "is missing"),
        ({"grade": "good"}, "is 'good'"),
        ({"uncertainty": -1.0}, "above 0"),
    ],
)
def test_broken_entries_are_refused(changes: dict[str, Any], says: str) -> None:
    with pytest.raises(RecordError, match=says):
        read_thickener("sodium_alginate", broken(**changes))


def test_broken_records_are_refused() -> None:
    whole = parse_file(str(ROOT), "thickeners/poly_ethylene_oxide.toml")
    for changes, says in (
        ({"surface_active": "no"}, "true or false"),
        ({"charge": "positive"}, "neutral, anionic"),
        ({"intrinsic_viscosity": {}}, "list of entries"),
        ({"colour": "white"}, "is not known here"),
    ):
        with pytest.raises(RecordError, match=says):
            read_thickener("poly_ethylene_oxide", {**whole, **changes})
    several = {**whole["intrinsic_viscosity"][0], "salt_concentration": [0.0, 1.0]}
    with pytest.raises(RecordError, match="one number for a neutral polymer"):
        read_thickener("poly_ethylene_oxide", {**whole, "intrinsic_viscosity": [several]})
