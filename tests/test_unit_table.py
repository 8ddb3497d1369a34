"""The table of kinds and trade units against pint, against definitions, and against the docs."""

from __future__ import annotations

import itertools
import re
from fractions import Fraction
from pathlib import Path

import numpy as np
import pint
import pytest

from dropkit.errors import BadInput
from dropkit.unit_table import KINDS, NOMENCLATURE, STANDARD_ATMOSPHERE, Kind, kind_of
from dropkit.unit_trade import NEEDLE_GAUGES, PREFIXED, PREFIXES, REFUSED, SINGLE, WHOLE
from dropkit.units import read

REGISTRY = pint.UnitRegistry()
PAGE = Path(__file__).parents[1] / "docs" / "nomenclature.md"
WITH_UNIT = [kind for kind in KINDS.values() if not kind.plain]


def exponents(unit: pint.Unit) -> tuple[float, ...]:
    """Exponents of metre, kilogram, second, ampere, kelvin, mole by pint."""
    found = dict(unit.dimensionality)
    names = ("length", "mass", "time", "current", "temperature", "substance")
    return tuple(found.get(f"[{name}]", 0) for name in names)


# --- kinds ---------------------------------------------------------------------------------


@pytest.mark.parametrize("kind", WITH_UNIT, ids=lambda kind: kind.name)
def test_pint_reads_both_units_and_agrees(kind: Kind) -> None:
    si, stock = REGISTRY.Unit(kind.si), REGISTRY.Unit(kind.stock)
    assert exponents(si) == kind.dimension
    one = REGISTRY.Quantity(1.0, stock).to(si).magnitude
    zero = REGISTRY.Quantity(0.0, stock).to(si).magnitude
    assert one - zero == pytest.approx(kind.per_stock, rel=1e-12)
    assert zero == pytest.approx(kind.zero, abs=1e-12)
    # The SI unit is one: pint's own base of the same dimension (kg for mass) gives 1.
    assert REGISTRY.Quantity(1.0, si).to_base_units().magnitude == pytest.approx(1.0, rel=1e-12)


@pytest.mark.parametrize("kind", WITH_UNIT, ids=lambda kind: kind.name)
def test_the_parser_reads_both_units(kind: Kind) -> None:
    assert read(f"1 {kind.si}", kind, "x", domain="any")[0] == 1.0
    stock = read(f"1 {kind.stock}", kind, "x", domain="any")[0]
    assert stock == pytest.approx(kind.per_stock + kind.zero, rel=1e-15)


@pytest.mark.parametrize("kind", KINDS.values(), ids=lambda kind: kind.name)
def test_windows_and_slips_are_consistent(kind: Kind) -> None:
    assert kind.words.startswith(("a ", "an "))
    if kind.plausible is None:
        assert not kind.slips or kind.domain == "0..1"
        return
    low, high = kind.plausible
    assert low < high
    if kind.domain == "> 0":
        assert low >= 0
    for slip in kind.slips:
        # A slip lies outside the window, and what was meant inside it.
        assert slip.high <= low or slip.low >= high, slip
        if slip.unit:
            middle = np.sign(slip.low) * np.sqrt(slip.low * slip.high) * slip.factor
            assert low <= middle <= high, slip


# Measured liquids at 1 atm, light to heavy: none of them may look implausible.
# Water: IAPWS R6-95, R12-08 and R1-76 at 293.15 K; all others [from memory].
LIQUIDS = {
    "water": (998.2, 1.0016e-3, 0.07274, 293.15),
    "glycerol": (1261.1, 1.41, 0.0634, 293.15),
    "n-pentane": (626.0, 2.3e-4, 0.0160, 293.15),
    "propane at its boiling point": (581.0, 2.0e-4, 0.0157, 231.0),
    "mercury": (13546.0, 1.55e-3, 0.486, 293.15),
    "iron at its melting point": (7035.0, 5.5e-3, 1.87, 1811.0),
    "tungsten at its melting point": (16.7e3, 7.0e-3, 2.5, 3695.0),
    "silicone oil, 100000 cSt": (977.0, 97.7, 0.0215, 298.15),
    "perfluorohexane": (1680.0, 6.5e-4, 0.0119, 298.15),
}


@pytest.mark.parametrize("name", LIQUIDS)
def test_no_real_liquid_is_implausible(name: str) -> None:
    density, viscosity, surface_tension, temperature = LIQUIDS[name]
    given = {
        "density": density,
        "viscosity": viscosity,
        "kinematic_viscosity": viscosity / density,
        "surface_tension": surface_tension,
        "temperature": temperature,
    }
    for word, value in given.items():
        assert read(value, word, word, plausible=True) == (value, None)


def test_every_word_leads_to_a_kind() -> None:
    for word, kind in NOMENCLATURE.items():
        assert kind in KINDS
        assert re.fullmatch(r"[a-z]+(_[a-z]+)*", word)
        if word in KINDS:
            assert kind == word, f"{word} is a kind of its own and may mean nothing else"


def test_kind_of_reads_words_kinds_and_domains() -> None:
    assert kind_of("gas_density") == (KINDS["density"], "> 0")
    assert kind_of("velocity > 0") == (KINDS["velocity"], "> 0")
    assert kind_of("time  >= 0") == (KINDS["time"], ">= 0")
    assert kind_of("humidity") == (KINDS["humidity"], "0..1")
    with pytest.raises(BadInput, match=r"'vicosity'.*Did you mean .*'viscosity'"):
        kind_of("vicosity")
    with pytest.raises(BadInput, match="domain '< 0' is not known"):
        kind_of("velocity < 0")
    with pytest.raises(BadInput):
        kind_of("")


# --- trade units -----------------------------------------------------------------------------

LABELLED = {**SINGLE, **PREFIXED}


@pytest.mark.parametrize("word", [word for word, (_, name) in LABELLED.items() if name])
def test_units_with_a_long_name_are_those_of_pint(word: str) -> None:
    unit, name = LABELLED[word]
    factor, roots = REGISTRY.get_root_units(name)
    grams = dict(roots._units).get("gram", 0)
    assert float(unit.factor) == pytest.approx(factor * 1000.0**-grams, rel=1e-12)
    assert exponents(REGISTRY.Unit(name)) == unit.dimension


# Definitions: NIST SP 811 (2008) app. B.8 [from memory]; exact products where they are exact.
DEFINED = {
    "psi": 6894.757293168361,  # lbf/in2
    "mmHg": 133.322387415,  # conventional, 13595.1 kg/m3
    "inHg": 3386.388640341,
    "mmH2O": 9.80665,
    "cmH2O": 98.0665,
    "inH2O": 249.08891,  # conventional, 1000 kg/m3
    "atm": 101325.0,
    "torr": 133.32236842105263,  # 101325/760
    "gpm": 3.785411784e-3 / 60,
    "lpm": 1e-3 / 60,
    "US_gal": 3.785411784e-3,
    "imp_gal": 4.54609e-3,
    "cc": 1e-6,
    "gsm": 1e-3,
    "fpm": 0.3048 / 60,
}


@pytest.mark.parametrize("word", DEFINED)
def test_units_that_pint_lacks_or_gets_wrong(word: str) -> None:
    assert float(SINGLE[word][0].factor) == pytest.approx(DEFINED[word], rel=1e-12)


def test_every_unit_without_a_long_name_is_checked() -> None:
    nameless = {word for word, (_, name) in LABELLED.items() if not name}
    assert nameless - {"Pas", "Da"} <= {*DEFINED, "Torr", "LPM"}
    assert SINGLE["Torr"] == SINGLE["torr"]
    assert SINGLE["LPM"] == SINGLE["lpm"]
    assert read("1 kDa", "molar_mass", "x")[0] == read("1 kg/mol", "molar_mass", "x")[0] == 1.0


@pytest.mark.parametrize("prefix", PREFIXES)
def test_prefixes_are_those_of_pint(prefix: str) -> None:
    power, name = PREFIXES[prefix]
    assert REGISTRY.Quantity(1.0, f"{name}meter").to("m").magnitude == pytest.approx(10.0**power)


def test_no_word_is_a_prefix_and_a_unit_by_chance() -> None:
    # "min" is a minute although "m" and "in" exist: such words must stand in SINGLE.
    for prefix in PREFIXES:
        for word in PREFIXED:
            assert prefix + word not in PREFIXED, (prefix, word)
    assert SINGLE["min"][0].factor == 60
    assert SINGLE["ft"][0].factor == Fraction("0.3048")


def test_refused_words_are_in_no_table() -> None:
    for word in ("oz", "gal", "M"):
        assert word not in SINGLE
        assert word not in PREFIXED
    assert not REFUSED.keys() & WHOLE.keys()


def test_marks_are_accepted_by_some_kind() -> None:
    accepted = frozenset().union(*(kind.accepts for kind in KINDS.values()))
    assert {unit.mark for unit in WHOLE.values() if unit.mark} <= accepted


def test_the_two_pressure_letters() -> None:
    assert STANDARD_ATMOSPHERE == 101325.0
    for form in ("barg", "bar(g)", "bar g", "bar (g)", "psig", "psi(g)"):
        assert WHOLE[form].mark == "gauge"
    for form in ("bara", "bar(a)", "bar a", "psia", "mbara", "kPa(a)"):
        assert WHOLE[form].mark == "absolute"


# Outer diameters [mm] of the same chart: a bore is thinner than its tube.
OUTER = {18: 1.270, 21: 0.8192, 25: 0.5144, 27: 0.4128, 30: 0.3112, 31: 0.2604}


def test_needles_get_thinner_and_stay_inside_their_tubes() -> None:
    bores = [NEEDLE_GAUGES[number] for number in sorted(NEEDLE_GAUGES)]
    assert all(wide >= narrow for wide, narrow in itertools.pairwise(bores))
    for number, outer in OUTER.items():
        assert 0.3 * outer < NEEDLE_GAUGES[number] / 1000 < 0.8 * outer


# --- the page ------------------------------------------------------------------------------


def rows(heading: str) -> dict[str, list[str]]:
    """The rows of the table on the page whose header starts with a word."""
    lines = PAGE.read_text(encoding="utf-8").splitlines()
    start = next(n for n, line in enumerate(lines) if line.startswith(f"| {heading} |"))
    found = {}
    for line in lines[start + 2 :]:
        if not line.startswith("|"):
            break
        cells = [cell.strip() for cell in line.strip("|").split("|")]
        found[cells[0].strip("`")] = cells[1:]
    return found


def test_the_page_lists_every_word_with_its_units() -> None:
    table = rows("word")
    assert table.keys() == NOMENCLATURE.keys()
    assert list(table) == sorted(table)
    for word, (symbol, si, stock, domain, meaning) in table.items():
        kind = KINDS[NOMENCLATURE[word]]
        assert (si, stock, domain) == (kind.si or "-", kind.stock or "-", kind.domain), word
        assert symbol
        assert meaning


def test_the_page_lists_every_other_kind() -> None:
    table = rows("kind")
    assert table.keys() == KINDS.keys() - NOMENCLATURE.keys()
    for name, (si, stock, domain, meaning) in table.items():
        kind = KINDS[name]
        assert (si, stock, domain) == (kind.si or "-", kind.stock or "-", kind.domain), name
        assert meaning


def test_the_page_names_no_unit_that_is_not_read() -> None:
    for cell in rows("written"):
        for word in re.findall(r"[^`,]+", cell.replace("`, `", ",").replace("`", "")):
            unit = word.strip()
            known = (
                unit in WHOLE or unit in SINGLE or unit in REFUSED or unit in ("30 G", "30 gauge")
            )
            if not known:
                kinds = ("viscosity", "kinematic_viscosity", "flow", "density", "temperature",
                         "molar_mass")  # fmt: skip
                assert any(readable(f"1 {unit}", kind) for kind in kinds), unit


def readable(text: str, kind: str) -> bool:
    """Whether a string is read as a kind."""
    try:
        read(text, kind, "x")
    except BadInput:
        return False
    return True
