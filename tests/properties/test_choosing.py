"""Choosing among liquids: the values are those of the records, and none is lost in silence."""

from __future__ import annotations

import json
import math
import warnings
from pathlib import Path
from typing import Any

import made_up_records as made_up
import numpy as np
import pandas as pd
import pint
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit import records
from dropkit.errors import BadInput, ImplausibleValue, RecalledWarning, UnitError, UnknownName
from dropkit.properties.choosing import Choosable, choosable, choose
from dropkit.properties.property_words import PROPERTIES
from dropkit.provenance import GRADES
from dropkit.record_index import CHOSEN_BY


@pytest.fixture
def store(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> records.Store:
    """The made-up folder in the place of dropkit's own."""
    store = records.Store(str(made_up.write(tmp_path / "data")))
    monkeypatch.setattr(records, "_STORE", store)
    return store


# The values ----------------------------------------------------------------------------------


def temperatures(fluid: Any, prop: str) -> list[float]:
    """Ends of the blocks of a property, what lies between, and just beside."""
    limits = fluid.range(prop)
    parts = ("viscosity", "density") if prop == "kinematic_viscosity" else (prop,)
    blocks = [block for part in parts for block in fluid.record.properties[part]]
    ends = sorted({end for block in blocks for end in (block.range.low, block.range.high)})
    points = [*ends, *np.linspace(limits.low, limits.high, 5).tolist()]
    points += [math.nextafter(end, side) for end in ends for side in (0.0, 1e4)]
    return [point for point in points if limits.low <= point <= limits.high]


@pytest.mark.parametrize("key", sorted(records.selection()))
def test_values_of_the_table_are_those_of_the_record(key: str) -> None:
    fluid, table = dk.liquid(key), choosable()
    warnings.simplefilter("ignore", RecalledWarning)
    for prop in fluid.available():
        curve = getattr(fluid, prop)
        for kelvin in temperatures(fluid, prop):
            found = table.look(key, prop, kelvin)
            assert not isinstance(found, str)
            trail = fluid.trail(prop, kelvin)
            assert found.value == curve(kelvin)
            assert found.uncertainty == pytest.approx(trail.uncertainty * found.value, rel=1e-12)
            assert found.grade == trail.grade
        limits = fluid.range(prop)
        for beyond in (limits.low - 0.01, limits.high + 0.01):
            assert "is known from" in str(table.look(key, prop, beyond))


@pytest.mark.parametrize("key", sorted(records.selection()))
def test_constants_of_the_table_are_those_of_the_record(key: str) -> None:
    facts = records.liquid_record(key).facts
    held = records.selection()[key]
    assert held["constants"] == {name: facts[name]["value"] for name in CHOSEN_BY if name in facts}
    assert held.get("method") == facts.get("flash_point", {}).get("method")


def test_the_table_serves_what_the_records_serve() -> None:
    liquids = dk.liquids()
    assert set(records.selection()) == set(liquids.index[liquids["kind"] == "liquid"])
    table = Choosable(records.selection())
    for key, prop in ((key, prop) for key in table.held for prop in PROPERTIES):
        lacks = table.look(key, prop, 1.0)
        assert isinstance(lacks, str)
        held = dk.liquid(key).available()
        if prop == "kinematic_viscosity" and {"density", "viscosity"} <= set(held):
            continue  # both are there, if not always at common temperatures
        assert ("its record has no" in lacks) == (prop not in held)


def test_the_example_of_the_trade() -> None:
    found = dk.choose(
        viscosity=("2 mPa*s", "5 mPa*s"), flash_point_above="60 degC", at="20 degC", grade="single"
    )
    # DMSO: 2.14 mPa*s at 20 degC and 89 degC closed cup; n-hexadecane 3.45 mPa*s and 135 degC
    # (usual figures of handbooks, from memory; only their place between the limits is used).
    assert {"dimethyl_sulfoxide", "n-hexadecane"} <= set(found.index)
    assert found["viscosity [mPa*s]"].between(2.0, 5.0).all()
    assert found["viscosity [mPa*s]"].is_monotonic_increasing
    assert (found["flash_point [degC]"] > 60.0).all()
    for key, row in found.iterrows():
        fluid = dk.liquid(key)
        assert row["viscosity [mPa*s]"] == pytest.approx(1e3 * fluid.viscosity(293.15), rel=1e-12)
        spread = fluid.trail("viscosity", 293.15).uncertainty * row["viscosity [mPa*s]"]
        assert row["u(viscosity) [mPa*s]"] == pytest.approx(spread, rel=1e-12)
        assert row["viscosity grade"] == fluid.grade("viscosity")
        assert row["flash_point method"] == fluid.flash_point["method"]
    assert "safety data sheet" in found.attrs["cautions"][0]


# On made-up liquids: alpha has everything, beta neither surface tension nor constants --------


def test_columns_and_attributes(store: records.Store) -> None:
    found = choose(viscosity=("0.1 Pa*s", "1 Pa*s"), flash_point_below=300.0, at=300.0)
    assert list(found.columns) == [
        *("name", "cas", "family", "grade", "viscosity [mPa*s]", "u(viscosity) [mPa*s]"),
        *("viscosity grade", "flash_point [K]", "flash_point method", "note"),
    ]
    assert list(found.index) == ["alpha"]
    assert found.index.name == "key"
    row = found.loc["alpha"]
    # exp(-4 + 500/150) by hand, 1 % of it, and the constant as the file has it
    assert row["viscosity [mPa*s]"] == pytest.approx(513.417119, rel=1e-8)
    assert row["u(viscosity) [mPa*s]"] == pytest.approx(5.13417119, rel=1e-8)
    assert (row["flash_point [K]"], row["flash_point method"]) == (290.0, "closed cup")
    assert found.attrs["message"] == "1 of 2 liquids at 26.85 degC"
    assert found.attrs["criteria"] == [
        "viscosity from 100 to 1000 mPa*s",
        "flash_point below 26.85 degC",
    ]
    assert found.attrs["failed"] == {
        "viscosity from 100 to 1000 mPa*s": 1,
        "flash_point below 26.85 degC": 0,
    }
    assert json.loads(json.dumps(found.attrs)) == found.attrs
    # No data file was opened for it.
    assert store._liquids == {}


def test_what_cannot_be_judged_is_named(store: records.Store) -> None:
    found = choose(surface_tension_above=0.01, flash_point_above=280.0, at=300.0)
    assert list(found.index) == ["alpha"]
    assert found.attrs["left_out"] == {
        "beta": "its record has no surface_tension; its record has no flash_point"
    }
    assert found.attrs["message"] == "1 of 1 liquids at 26.85 degC; 1 more left out, see left_out"
    hot = choose(viscosity_below=10.0, at=390.0)
    assert list(hot.index) == ["alpha"]
    assert hot.attrs["left_out"] == {"beta": "viscosity is known from -23.15 to 56.85 degC"}


def test_what_fails_anyway_is_not_called_unjudged(store: records.Store) -> None:
    # beta has no surface tension, but its density alone turns it away.
    found = choose(density_above=900.0, surface_tension_above=0.01, at=300.0)
    assert list(found.index) == ["alpha"]
    assert found.attrs["left_out"] == {}
    assert found.attrs["failed"]["density above 900 kg/m3"] == 1


def test_solids_and_solutes_are_not_offered(store: records.Store) -> None:
    found = choose(density_above=100.0, at=259.0)
    assert list(found.index) == ["beta"]
    assert found.attrs["left_out"] == {"alpha": "solid: melts at -13.1 degC"}
    assert list(choose(density_above=100.0, at=260.0).index) == ["beta", "alpha"]
    assert choose(family="salt").empty


def test_above_the_boiling_point_the_pressure_is_said(store: records.Store) -> None:
    found = choose(density_above=100.0, at=390.0)
    # 10**(9.4798714 - 1700/390) Pa = 1.32 bar, by hand
    assert found.loc["alpha", "note"] == (
        "needs p >= 1.32 bar (absolute): boils at 106.9 degC at 1 atm"
    )
    assert found.loc["beta", "note"] == ""  # its record has no boiling point
    made_up.edit(
        Path(store.root), "liquids/alpha.toml", "range = [280.0, 400.0]", "range = [280.0, 385.0]"
    )
    records._STORE = records.Store(store.root)
    (Path(store.root) / "selection.json").unlink()
    assert choose(density_above=100.0, at=390.0).loc["alpha", "note"].startswith("needs pressure: ")


def test_nobody_fulfils_it(store: records.Store) -> None:
    found = choose(viscosity=("2 mPa*s", "5 mPa*s"), density=(900.0, 950.0), at="300 K")
    assert found.empty
    assert found["viscosity [mPa*s]"].dtype == float
    assert found["name"].dtype == object
    assert found.attrs["failed"] == {
        "viscosity from 2 to 5 mPa*s": 2,
        "density from 900 to 950 kg/m3": 2,
    }
    # Both miss both; beta by less: ln(2/1.503) + ln(900/800) against ln(513/5) + ln(1000/950)
    assert found.attrs["nearest"] == {
        "beta": "viscosity 1.503 mPa*s, wanted from 2 to 5 mPa*s; "
        "density 800 kg/m3, wanted from 900 to 950 kg/m3",
        "alpha": "viscosity 513.4 mPa*s, wanted from 2 to 5 mPa*s; "
        "density 1000 kg/m3, wanted from 900 to 950 kg/m3",
    }
    assert found.attrs["message"] == (
        "0 of 2 liquids at 26.85 degC; viscosity from 2 to 5 mPa*s turned away 2"
    )


def test_fewest_missed_criteria_come_nearest(store: records.Store) -> None:
    found = choose(viscosity_above=0.6, density_above=900.0, at=300.0)
    assert list(found.attrs["nearest"]) == ["alpha", "beta"]


def test_ends_of_a_range_count_and_limits_do_not(store: records.Store) -> None:
    assert list(choose(density=(800.0, 1000.0), at=300.0).index) == ["beta", "alpha"]
    assert list(choose(density=(None, 800.0), at=300.0).index) == ["beta"]
    assert list(choose(density=(1000.0, None), at=300.0).index) == ["alpha"]
    assert choose(density_above=1000.0, at=300.0).empty
    assert choose(density_below=800.0, at=300.0).empty
    assert list(choose(flash_point=(290.0, 290.0)).index) == ["alpha"]
    assert choose(flash_point_above=290.0).empty


def test_two_criteria_of_one_property_share_its_columns(store: records.Store) -> None:
    found = choose(density_above=900.0, density_below="1.1 g/cm3", at=300.0)
    assert list(found.index) == ["alpha"]
    assert [name for name in found.columns if "density" in name] == [
        *("density [kg/m3]", "u(density) [kg/m3]", "density grade"),
    ]


def test_the_first_criterion_orders(store: records.Store) -> None:
    by_density = choose(density_above=100.0, viscosity_above=1e-4, at=300.0)
    by_viscosity = choose(viscosity_above=1e-4, density_above=100.0, at=300.0)
    assert list(by_density.index) == list(by_viscosity.index) == ["beta", "alpha"]
    assert list(choose(molar_mass_above=0.01).index) == ["alpha", "beta"]


def test_kinematic_viscosity_is_a_quotient(store: records.Store) -> None:
    row = choose(kinematic_viscosity_above=1e-6, density_above=900.0, at=300.0).loc["alpha"]
    assert row["kinematic_viscosity [m2/s]"] == pytest.approx(0.513417119 / 1000.0, rel=1e-8)
    relative = row["u(kinematic_viscosity) [m2/s]"] / row["kinematic_viscosity [m2/s]"]
    assert relative == pytest.approx(math.hypot(0.01, 0.001), rel=1e-9)
    assert row["kinematic_viscosity grade"] == "single"


def test_the_grade_is_the_worst_accepted(store: records.Store) -> None:
    assert list(choose(density_above=100.0, at=300.0, grade="single").index) == ["beta", "alpha"]
    found = choose(density_above=100.0, at=300.0, grade="measured")
    assert list(found.index) == ["alpha"]
    assert found.loc["alpha", "grade"] == "measured"
    assert found.attrs["nearest"] == {"beta": "grade single, wanted at least measured"}
    assert found.attrs["failed"]["grade at least measured"] == 1
    # Without a property it is the liquid's, which beta has none of.
    found = choose(grade="single")
    assert list(found.index) == ["alpha"]
    assert found.attrs["left_out"]["beta"].startswith("it has no grade")
    assert choose(grade="reference").empty
    worst = choose(density_above=100.0, surface_tension_above=0.001, at=300.0)
    assert worst.loc["alpha", "grade"] == "measured"


def test_families(store: records.Store) -> None:
    for family in ("invented", "Invented", ["invented"], ("invented", "salt"), {"invented"}):
        assert list(choose(family=family).index) == ["alpha", "beta"]
    with pytest.raises(UnknownName, match="no family is called 'invent'") as caught:
        choose(family="invent")
    assert caught.value.choices == ("invented",)
    for family in ("", 3, [], [3], None):
        with pytest.raises((BadInput, UnknownName)):
            choose(family=family)


def test_values_from_memory_warn_once(store: records.Store) -> None:
    with pytest.warns(RecalledWarning, match="values of alpha rest on memory") as caught:
        found = choose(heat_of_vaporisation_above=1e5, at=300.0)
    assert len(caught) == 1
    assert caught[0].filename == __file__
    assert found.loc["alpha", "grade"] == "recalled"
    assert choose(heat_of_vaporisation_above=1e5, at=300.0, grade="single").empty


def test_a_flash_point_brings_its_caution(store: records.Store) -> None:
    assert "safety data sheet" in choose(flash_point_above=280.0).attrs["cautions"][0]
    assert choose(boiling_point_above=280.0).attrs["cautions"] == []


def test_two_records_with_one_name_stop_it(store: records.Store) -> None:
    made_up.edit(Path(store.root), "liquids/alpha.toml", '"first liquid"', '"BTA"')
    (Path(store.root) / "index.json").unlink()
    records._STORE = records.Store(store.root)
    for call in (lambda: choose(density_above=100.0, at=300.0), dk.liquids):
        with pytest.raises(dk.errors.RecordError, match="two records with one name"):
            call()


# Input ---------------------------------------------------------------------------------------


def test_every_form_of_a_range_means_the_same(store: records.Store) -> None:
    registry = pint.get_application_registry()
    forms: list[Any] = [
        ("1 mPa*s", "600 mPa*s"),
        ["1 cP", "0.6 Pa*s"],
        ((1, "mPa*s"), (600, "mPa*s")),
        ([1.0, 600.0], "mPa*s"),
        (np.array([1.0, 600.0]), "mPa*s"),
        registry.Quantity([1.0, 600.0], "mPa*s"),
        (registry.Quantity(1.0, "mPa*s"), registry.Quantity(0.6, "Pa*s")),
        (1e-3, 0.6),
        [1e-3, 0.6],
        np.array([1e-3, 0.6]),
        pd.Series([1e-3, 0.6]),
        (0, "0.6 Pa*s"),
        (None, 0.6),
    ]
    for form in forms:
        found = choose(viscosity=form, at=300.0)
        assert list(found.index) == ["beta", "alpha"], form


@pytest.mark.parametrize(
    "value",
    [
        "2 mPa*s", 0.002, (2, "mPa*s"), None, (1.0,), (1.0, 2.0, 3.0), (0.005, 0.002),
        (None, None), ("5 mPa*s", "2 mPa*s"), (2, "5 mPa*s"), ("2 mPa*s", 5.0), (math.nan, 1.0),
        np.array([math.nan, 1.0]), ([5, 2], "mPa*s"), (True, 1.0), {"low": 1.0}, ((1, 2), (3, 4)),
    ],
)  # fmt: skip
def test_what_is_no_range_is_refused(store: records.Store, value: Any) -> None:
    with pytest.raises(BadInput):
        choose(viscosity=value, at=300.0)


@pytest.mark.parametrize("value", [None, math.nan, (1.0, 2.0), [1.0, 2.0], True, "x", "", -1.0])
def test_what_is_no_limit_is_refused(store: records.Store, value: Any) -> None:
    with pytest.raises(BadInput):
        choose(viscosity_above=value, at=300.0)


def test_units_that_do_not_fit_are_refused(store: records.Store) -> None:
    with pytest.raises(UnitError, match="lowest viscosity"):
        choose(viscosity=("2 m/s", "5 m/s"), at=300.0)
    with pytest.raises(UnitError, match="flash_point_above"):
        choose(flash_point_above="3 mPa*s")
    with pytest.raises(UnitError, match="at = "):
        choose(viscosity_above=1.0, at="3 mPa*s")


def test_likely_slips_are_named(store: records.Store) -> None:
    with pytest.raises(ImplausibleValue, match=r"60 degC is 333\.15"):
        choose(flash_point_above=60)
    with pytest.raises(ImplausibleValue, match=r"25 degC is 298\.15"):
        choose(density_above=100.0, at=25)
    with pytest.raises(ImplausibleValue, match="20 mN/m was probably meant"):
        choose(surface_tension=(20, 40), at=300.0)
    with pytest.raises(ImplausibleValue, match="20 mN/m was probably meant"):
        choose(surface_tension=np.array([20.0, 40.0]), at=300.0)
    assert list(choose(flash_point_above=60, plausible=False).index) == ["alpha"]


def test_unknown_criteria_give_the_nearest(store: records.Store) -> None:
    for word, near in {
        "viscosty": "viscosity",
        "flash_point_abov": "flash_point_above",
        "surface_tension_under": "surface_tension",
        "familly": "family",
        "temperature": "critical_temperature",
    }.items():
        with pytest.raises(BadInput, match=f"no criterion '{word}'") as caught:
            choose(**{word: 3.0, "at": 300.0})
        assert near in caught.value.choices, caught.value.choices


def test_a_property_needs_a_temperature(store: records.Store) -> None:
    with pytest.raises(BadInput, match="needs at=, the temperature of viscosity"):
        choose(flash_point_above="10 degC", viscosity_above=1e-3)
    with pytest.raises(BadInput, match="at is"):
        choose(viscosity_above=1e-3, at=[300.0, 310.0])
    assert list(choose(flash_point_above="10 degC").index) == ["alpha"]


def test_nothing_to_choose_by_is_refused(store: records.Store) -> None:
    for options in ({}, {"at": 300.0}):
        with pytest.raises(BadInput, match="nothing to choose by"):
            choose(**options)
    with pytest.raises(UnknownName, match="no grade is called 'mesured'") as caught:
        choose(grade="mesured")
    assert caught.value.choices == ("measured",)


def test_an_empty_folder_gives_an_empty_table(
    tmp_path: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    (tmp_path / "dropkit-data.toml").write_text(made_up.MARKER)
    monkeypatch.setattr(records, "_STORE", records.Store(str(tmp_path)))
    found = choose(density_above=100.0, at=300.0)
    assert found.empty
    assert found.attrs["nearest"] == {}
    assert found.attrs["message"] == "0 of 0 liquids at 26.85 degC"


# Every liquid of dropkit's own, whatever is asked ----------------------------------------------


@given(
    prop=st.sampled_from(sorted(PROPERTIES)),
    ends=st.lists(st.floats(1e-12, 1e12), min_size=2, max_size=2).map(sorted),
    kelvin=st.floats(150.0, 1500.0),
    grade=st.sampled_from(GRADES[:4]),
)
def test_each_liquid_passes_fails_or_is_left_out(
    prop: str, ends: list[float], kelvin: float, grade: str
) -> None:
    found = choose(**{prop: tuple(ends)}, at=kelvin, grade=grade, plausible=False)
    left = found.attrs["left_out"]
    assert not set(found.index) & set(left)
    table = choosable()
    for key in table.held:
        value = table.look(key, prop, kelvin)
        melts = table.held[key]["constants"].get("melting_point")
        frozen = melts is not None and kelvin < melts
        if isinstance(value, str) or frozen:
            assert key in left
        else:
            good = GRADES.index(value.grade) <= GRADES.index(grade)
            assert (key in found.index) == (ends[0] <= value.value <= ends[1] and good)
    assert set(found.attrs["nearest"]) <= set(table.held) - set(found.index) - set(left)
