"""Thickeners: names, entries, intrinsic viscosities, and which entry serves."""

from __future__ import annotations

import pickle
from typing import Any

import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import BadInput, DropkitError, MissingProperty, OutOfRange, UnknownName

ALL = ["sodium alginate", "CMC", "HPMC", "HPC", "PVA", "PEO", "xanthan"]


@pytest.mark.parametrize("name", ALL)
def test_every_thickener_is_found_shown_and_cited(name: str) -> None:
    polymer = dk.thickener(name)
    assert polymer == dk.thickener(polymer.record.cas)
    assert polymer == pickle.loads(pickle.dumps(polymer))
    assert hash(polymer) == hash(dk.thickener(polymer.name))
    assert polymer.name in repr(polymer)
    assert len(polymer.table()) >= len(polymer.entries)
    lines = dk.cite(polymer).splitlines()
    assert len(lines) == len(polymer.sources)


def test_unknown_names_are_answered_with_what_there_is() -> None:
    with pytest.raises(UnknownName, match=r"'gelatin'.*sodium alginate"):
        dk.thickener("gelatin")
    with pytest.raises(UnknownName, match="Did you mean 'sodium alginate'"):
        dk.thickener("sodium alginat")
    with pytest.raises(UnknownName):
        dk.thickener(None)  # type: ignore[arg-type]  # what a caller may do


def test_intrinsic_viscosity_comes_in_the_unit_that_was_asked() -> None:
    peo = dk.thickener("PEO")
    bare = peo.intrinsic_viscosity(1000.0, entry=2)
    assert type(bare) is float
    # Kawaguchi et al. 1997, abstract: 4.33e-4 Mw^0.679 dL/g, for 1e6 g/mol.
    assert bare == pytest.approx(0.1 * 4.33e-4 * 1e6**0.679, rel=1e-12)
    shown = peo.intrinsic_viscosity("1 MDa", entry=2)
    assert f"{shown:.1f}" == "513.4 milliliter / gram"
    assert peo.overlap_concentration(1000.0, entry=2) == pytest.approx(1.0 / bare, rel=1e-15)


def test_the_first_entry_that_serves_is_taken() -> None:
    peo = dk.thickener("PEO")
    assert peo.chosen(molar_mass=1000.0).entry is peo.entries[0]
    # Outside what the first was fitted to, the published relation serves.
    assert peo.chosen(molar_mass="20 kDa").entry is peo.entries[1]
    wrong: Any
    for wrong in (0, 3, True, "2", 1.0):
        with pytest.raises(BadInput, match="has no entry"):
            peo.chosen(molar_mass=1000.0, entry=wrong)
    with pytest.raises(MissingProperty):
        peo.chosen(molar_mass="20 kDa", entry=1)


def test_nominal_molar_masses_are_not_weight_averages() -> None:
    # Both relations of poly(ethylene oxide) in water: nominal ones lie far above the other.
    peo = dk.thickener("PEO")
    for mass in (400.0, 1000.0, 4000.0):
        ratio = peo.intrinsic_viscosity(mass) / peo.intrinsic_viscosity(mass, entry=2)
        assert 1.3 < ratio < 1.55


def test_a_charged_polymer_needs_its_salt() -> None:
    cmc = dk.thickener("CMC")
    with pytest.raises(MissingProperty, match=r"5\.4 to 2000 mol/m3 of sodium chloride"):
        cmc.intrinsic_viscosity("337 kDa")
    with pytest.raises(MissingProperty):
        dk.thickener("alginate").intrinsic_viscosity("100 kDa", salt="20 mmol/L")
    swollen = cmc.intrinsic_viscosity(337.5, salt="10 mmol/L")
    shrunk = cmc.intrinsic_viscosity(337.5, salt="0.5 mol/L")
    assert swollen > 2 * shrunk
    assert str(swollen.units) == "milliliter / gram"


def test_a_neutral_polymer_does_not_mind_salt() -> None:
    hpmc = dk.thickener("HPMC")
    assert hpmc.intrinsic_viscosity(430.0) == hpmc.intrinsic_viscosity(430.0, salt=500.0)


def test_what_is_missing_is_said_with_the_conditions_that_were_seen() -> None:
    with pytest.raises(MissingProperty, match=r"250 kg/mol.*95 to 105 kg/mol in 100 mol/m3"):
        dk.thickener("alginate").chosen(molar_mass="250 kDa", salt="0.1 mol/L")
    with pytest.raises(MissingProperty, match="these salt concentrations only"):
        dk.thickener("alginate").chosen(intrinsic_viscosity=0.5, salt=0.0)


def test_one_of_molar_mass_and_intrinsic_viscosity() -> None:
    peo = dk.thickener("PEO")
    with pytest.raises(BadInput, match="one of molar_mass and intrinsic_viscosity"):
        peo.chosen()
    with pytest.raises(BadInput, match="one of"):
        peo.chosen(molar_mass=1000.0, intrinsic_viscosity=0.5)
    with pytest.raises(BadInput, match="uncertainty is that of your own"):
        peo.chosen(molar_mass=1000.0, uncertainty=0.1)
    with pytest.raises(BadInput, match="relative, 0 to 1"):
        peo.chosen(intrinsic_viscosity=0.5, uncertainty=3.0)
    with pytest.raises(BadInput, match="513 mL/g was probably meant"):
        peo.chosen(intrinsic_viscosity=513.0)


def test_temperatures_outside_an_entry_are_refused() -> None:
    with pytest.raises(OutOfRange, match="20 to 30 degC"):
        dk.thickener("xanthan").intrinsic_viscosity(7000.0, salt=100.0, temperature="40 degC")


@given(st.sampled_from(ALL), st.floats(1.0, 2e4), st.floats(0.0, 3000.0))
def test_a_value_is_of_plausible_size_or_an_error_of_ours(
    name: str,
    mass: float,
    salt: float,
) -> None:
    try:
        value = dk.thickener(name).intrinsic_viscosity(mass, salt=salt)
    except DropkitError:
        return
    assert 1e-3 < value < 20.0


@pytest.mark.parametrize("odd", [True, None, "1 %", "x", [1.0], (1.0, "kDa", 2), -1.0, 1j])
def test_odd_input_is_an_error_of_ours(odd: Any) -> None:
    with pytest.raises(DropkitError):
        dk.thickener("PEO").intrinsic_viscosity(odd)
    with pytest.raises(DropkitError):
        dk.thickener("CMC").intrinsic_viscosity(337.5, salt=odd)
