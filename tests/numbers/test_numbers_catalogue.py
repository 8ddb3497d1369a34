"""The catalogue lists what the folder holds, and each entry says what a reader needs."""

from __future__ import annotations

import re
import subprocess
import sys
from pathlib import Path

import pytest

from dropkit import numbers
from dropkit.boundary import Boundary
from dropkit.numbers.catalogue import Entry, entries

every_number = pytest.mark.parametrize("entry", entries(), ids=lambda entry: entry.name)

# Every number that the project's second issue lists, by the name it has here.
ASKED_FOR = {
    "reynolds",
    "weber",
    "gas_weber",
    "ohnesorge",
    "z_number",
    "laplace",
    "capillary",
    "bond",
    "bond_root",
    "morton",
    "froude",
    "galilei",
    "archimedes",
    "stokes",
    "strouhal",
    "reduced_wavenumber",
    "wavelength_ratio",
    "deborah",
    "weissenberg",
    "elastocapillary",
    "bingham",
    "schmidt",
    "sherwood",
    "nusselt",
    "prandtl",
    "lewis",
    "spalding_mass",
    "spalding_heat",
    "peclet",
    "peclet_evaporation",
    "jakob",
    "stefan",
    "biot",
    "fourier",
    "knudsen",
    "cavitation_number",
    "discharge_coefficient",
    "marangoni",
    "electric_bond",
    "rayleigh_charge_ratio",
    "fissility",
    "taylor_field_ratio",
    "splash_parameter",
    "capillary_length",
    "capillary_time",
    "viscous_length",
    "viscous_time",
    "inertio_capillary_length",
    "inertio_capillary_time",
    "visco_capillary_length",
    "visco_capillary_time",
    "weber_radius",
    "reynolds_radius",
    "ohnesorge_radius",
}


def test_everything_asked_for_is_there() -> None:
    missing = ASKED_FOR - {entry.name for entry in entries()}
    assert not missing


def test_lazy_names_are_all_that_the_files_hold() -> None:
    listed = {name for name in numbers.__all__ if isinstance(getattr(numbers, name), Boundary)}
    assert listed == {entry.name for entry in entries()}
    assert set(numbers.__all__) <= set(dir(numbers))


@every_number
def test_an_entry_is_complete(entry: Entry) -> None:
    assert entry.title
    assert entry.symbol
    assert len(entry.compares) > 10
    assert "\n" not in entry.compares
    assert entry.function.__module__ == f"dropkit.numbers.{entry.theme}"
    sized = {"length", "radius"} & set(entry.arguments)
    assert bool(entry.scale) == bool(sized)
    if "radius" in entry.arguments:
        assert entry.scale.startswith("Radius")
    if "length" in entry.arguments:
        assert "iameter" in entry.scale


def test_symbols_are_not_shared() -> None:
    symbols = [entry.symbol for entry in entries()]
    assert len(set(symbols)) == len(symbols)


@every_number
def test_forms_on_the_radius_say_so_in_name_or_help(entry: Entry) -> None:
    if "radius" in entry.arguments and not entry.name.endswith("_radius"):
        assert (
            "radius" in entry.compares
            or "RADIUS" in (entry.function.__doc__ or "")
            or (
                entry.name
                == "reduced_wavenumber"  # circumference over wavelength: no diameter form
            )
        )


def test_overview_is_a_table() -> None:
    table = numbers.overview()
    assert list(table.index) == [entry.name for entry in entries()]
    assert table.loc["weber", "arguments"] == "density, surface_tension, velocity, length"
    assert table.loc["bond_root", "symbol"] == "Bo_CL"
    assert "57.7" in table.loc["splash_parameter", "limits"]


def test_a_new_file_is_found_without_a_list(tmp_path: Path) -> None:
    # The catalogue walks the folder: a file put on its path appears in it.
    (tmp_path / "invented_theme.py").write_text(
        '"""Invented."""\n'
        "from dropkit.boundary import physical\n"
        "__all__ = ['invented']\n"
        "@physical(returns='ratio')\n"
        "def invented(length: float) -> float:\n"
        '    """Invented number Iv: nothing against nothing."""\n'
        "    return length / length\n"
    )
    code = (
        "import dropkit.numbers as n\n"
        f"n.__path__.append({str(tmp_path)!r})\n"
        "print([e.symbol for e in n.entries() if e.theme == 'invented_theme'])"
    )
    run = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True, check=True)
    assert run.stdout.strip() == "['Iv']"


def test_without_docstrings_names_and_arguments_remain() -> None:
    code = "import dropkit.numbers as n; e = n.entries(); print(len(e), e[0].symbol == '')"
    run = subprocess.run(
        [sys.executable, "-OO", "-c", code], capture_output=True, text=True, check=True
    )
    assert run.stdout.split() == [str(len(entries())), "True"]


def test_a_misspelt_name_is_an_attribute_error() -> None:
    with pytest.raises(AttributeError, match="webber"):
        _ = numbers.webber  # type: ignore[attr-defined] # misspelt on purpose


PAGE = (Path(__file__).parents[2] / "docs" / "numbers.md").read_text(encoding="utf-8")


@every_number
def test_the_page_of_the_docs_says_the_same(entry: Entry) -> None:
    formula = re.search(r"Notes\n\s+-+\n\s+``(.+?)``", entry.function.__doc__ or "", re.DOTALL)
    assert formula
    size = next((s for s in ("length", "radius") if s in entry.arguments), "-")
    row = (
        f"| `{entry.name}` | `{' '.join(formula[1].split())}` | {entry.compares} "
        f"| {size.replace('length', 'diameter')} |"
    )
    assert row in PAGE


def test_the_page_of_the_docs_has_every_limit() -> None:
    from dropkit.numbers.limits import LIMITS

    for limit in LIMITS:
        bounds = ", ".join(f"{bound:.4g}" for bound in limit.bounds)
        assert f"| `{limit.number}` | {bounds} | {'; '.join(limit.sides)} |" in PAGE
