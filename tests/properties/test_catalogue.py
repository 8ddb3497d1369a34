"""Names: what resolves, what is ambiguous, what is unknown; the table of liquids."""

from __future__ import annotations

import subprocess
import sys
from pathlib import Path
from typing import Any

import made_up_records as made_up
import pandas as pd
import pytest
from hypothesis import assume, given
from hypothesis import strategies as st

from dropkit import records
from dropkit.errors import AmbiguousName, BadInput, DropkitError, UnknownName
from dropkit.properties.catalogue import family_names, liquids, resolve
from dropkit.record_types import PROPERTIES


@pytest.fixture
def store(tmp_path: Path, monkeypatch: pytest.MonkeyPatch) -> records.Store:
    """The made-up folder in the place of dropkit's own."""
    store = records.Store(str(made_up.write(tmp_path / "data")))
    monkeypatch.setattr(records, "_STORE", store)
    return store


@pytest.mark.parametrize(
    ("name", "key"),
    [
        ("alpha", "alpha"),
        ("ALPHA", "alpha"),
        (" alpha ", "alpha"),
        ("alpha liquid", "alpha"),
        ("Alpha_Liquid", "alpha"),
        ("alpha-liquid", "alpha"),
        ("alphaliquid", "alpha"),
        ("First  Liquid", "alpha"),
        ("11-23-4", "alpha"),
        ("11\u201023\u20104", "alpha"),
        ("BTA", "beta"),
        ("bta", "beta"),
        ("gamma", "gamma"),
    ],
)
def test_names_resolve_whatever_their_writing(store: records.Store, name: str, key: str) -> None:
    assert resolve(name) == key


@pytest.mark.parametrize(
    ("name", "suggestion"), [("alfa", "alpha"), ("betta", "beta"), ("a2", "alpha")]
)
def test_unknown_names_suggest_the_nearest(
    store: records.Store, name: str, suggestion: str
) -> None:
    with pytest.raises(UnknownName, match=f"no liquid is called '{name}'") as caught:
        resolve(name)
    assert caught.value.choices[0] == suggestion
    assert isinstance(caught.value, KeyError)


def test_one_suggestion_per_liquid(store: records.Store) -> None:
    with pytest.raises(UnknownName) as caught:
        resolve("alpha liquide")
    assert len({resolve(choice) for choice in caught.value.choices}) == len(caught.value.choices)


def test_a_cas_number_needs_its_hyphens(store: records.Store) -> None:
    with pytest.raises(UnknownName):
        resolve("11234")


@pytest.mark.parametrize("name", ["greek", "Greek", "GREEK "])
def test_ambiguous_names_give_the_choices(store: records.Store, name: str) -> None:
    with pytest.raises(AmbiguousName, match=r"several liquids.*Say which") as caught:
        resolve(name)
    assert caught.value.choices == ("alpha", "beta")


def test_ambiguous_without_any_record_still_names_the_choices(
    store: records.Store,
) -> None:
    made_up.edit(Path(store.root), "ambiguous.toml", '["alpha", "beta"]', '["psi", "omega"]')
    with pytest.raises(AmbiguousName, match="None of them has a record yet") as caught:
        resolve("greek")
    assert caught.value.choices == ("psi", "omega")


@pytest.mark.parametrize("name", [None, 3, 7.5, True, ["water"], b"water", {"water": 1}])
def test_what_is_no_text_is_refused(store: records.Store, name: Any) -> None:
    with pytest.raises(BadInput, match="no name of a liquid"):
        resolve(name)


@given(st.text())
def test_any_text_gives_a_key_or_an_error_of_ours(name: str) -> None:
    try:
        key = resolve(name)
    except DropkitError:
        key = None
    assert key is None or key in records.summaries()


def test_the_table_lists_every_record(store: records.Store) -> None:
    table = liquids()
    assert isinstance(table, pd.DataFrame)
    assert list(table.index) == ["alpha", "beta", "gamma"]
    assert table.index.name == "key"
    assert list(table.columns) == [
        *("name", "cas", "formula", "family", "kind", "grade"),
        *PROPERTIES,
    ]
    assert table.loc["alpha", "grade"] == "single"
    assert table.loc["alpha", "surface_tension"] == "reference"
    assert pd.isna(table.loc["beta", "grade"])
    assert pd.isna(table.loc["beta", "surface_tension"])
    assert table.loc["gamma", "kind"] == "solute"
    assert list(table.index[table["density"].notna()]) == ["alpha", "beta"]
    # No data file was opened for it.
    assert store._liquids == {}


@pytest.mark.parametrize(
    ("search", "keys"),
    [
        ("alpha", ["alpha"]),
        ("Alpha_Liq", ["alpha"]),
        ("liquid", ["alpha"]),
        ("first-liquid", ["alpha"]),
        ("bt", ["beta"]),
        ("a", ["alpha", "beta", "gamma"]),
        ("11-23-4", ["alpha"]),
        ("A2", ["alpha"]),
        ("(A)2", ["alpha"]),
        ("AA", ["alpha"]),
        ("invented", ["alpha", "beta"]),
        ("Salts", ["gamma"]),
        ("greek", ["alpha", "beta"]),
    ],
)
def test_a_search_finds_names_numbers_formulas_and_families(
    store: records.Store, search: str, keys: list[str]
) -> None:
    found = liquids(search)
    assert list(found.index) == keys
    assert found.equals(liquids().loc[keys])


@pytest.mark.parametrize("search", ["11-23", "1123", "23"])
def test_a_part_of_a_cas_number_finds_nothing(store: records.Store, search: str) -> None:
    with pytest.raises(UnknownName, match=f"no liquid matches '{search}'"):
        liquids(search)


def test_a_search_without_a_hit_says_families_and_the_nearest(store: records.Store) -> None:
    with pytest.raises(UnknownName, match="or a family: invented, salt") as caught:
        liquids("alfa liquid")
    assert caught.value.choices[0] == "Alpha Liquid"
    with pytest.raises(UnknownName) as caught:
        liquids("inventet")
    assert "invented" in caught.value.choices
    with pytest.raises(UnknownName, match=r"dropkit.liquid\('108-86-1'\) asks the engines"):
        liquids("108-86-1")


def test_an_ambiguous_search_without_records_says_so(store: records.Store) -> None:
    made_up.edit(Path(store.root), "ambiguous.toml", '["alpha", "beta"]', '["psi", "omega"]')
    with pytest.raises(AmbiguousName, match="None of them has a record yet"):
        liquids("greek")


@pytest.mark.parametrize("search", ["", "  ", "-", 3, True, ["water"], b"water"])
def test_what_cannot_be_searched_is_refused(store: records.Store, search: Any) -> None:
    with pytest.raises(BadInput, match="nothing to look for"):
        liquids(search)


@given(st.text())
def test_any_search_gives_rows_or_an_error_of_ours(search: str) -> None:
    try:
        found = set(liquids(search).index)
    except DropkitError:
        found = set()
    assert found <= set(records.summaries())


@given(st.data())
def test_every_part_of_a_name_finds_its_record(data: st.DataObject) -> None:
    key = data.draw(st.sampled_from(sorted(records.summaries())))
    entry = records.summaries()[key]
    name = data.draw(st.sampled_from([key, entry["name"], *entry["synonyms"]]))
    start = data.draw(st.integers(0, len(name) - 1))
    part = name[start : data.draw(st.integers(start + 1, len(name)))]
    assume(records.fold(part))
    assert key in liquids(part).index


def test_each_call_gives_a_table_of_its_own(store: records.Store) -> None:
    table = liquids()
    table.loc["alpha", "name"] = "changed"
    assert liquids().loc["alpha", "name"] == "alpha"


def test_an_empty_folder_gives_an_empty_table(
    tmp_path: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    (tmp_path / "dropkit-data.toml").write_text(made_up.MARKER)
    monkeypatch.setattr(records, "_STORE", records.Store(str(tmp_path)))
    table = liquids()
    assert table.empty
    assert "density" in table.columns
    with pytest.raises(UnknownName):
        resolve("water")


def test_looking_up_a_name_loads_no_pandas() -> None:
    code = (
        "import sys; from dropkit.properties.catalogue import resolve;"
        "resolve('water'); print('pandas' in sys.modules)"
    )
    done = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True, check=True)
    assert done.stdout.strip() == "False"


# dropkit's own names -----------------------------------------------------------------------

SHORT_FORMS = {
    "IPA": "2-propanol",
    "isopropyl alcohol": "2-propanol",
    "MEK": "2-butanone",
    "PG": "propylene_glycol",
    "EG": "ethylene_glycol",
    "DMSO": "dimethyl_sulfoxide",
    "DI water": "water",
    "deionised water": "water",
    "EtOH": "ethanol",
    "MeOH": "methanol",
    "glycerine": "glycerol",
    "glycerin": "glycerol",
    "NaCl": "sodium_chloride",
    "7732-18-5": "water",
    "56-81-5": "glycerol",
    "67-63-0": "2-propanol",
    "78-93-3": "2-butanone",
    "67-68-5": "dimethyl_sulfoxide",
    "7647-14-5": "sodium_chloride",
}


@pytest.mark.parametrize(("name", "key"), SHORT_FORMS.items())
def test_trade_short_forms_resolve(name: str, key: str) -> None:
    assert resolve(name) == key
    assert resolve(name.lower()) == key


@pytest.mark.parametrize(
    "name",
    ["xylene", "propanol", "butanol", "glycol", "hexanediol", "silicone oil", "Silicone-Oil"],
)
def test_names_that_stand_for_several_liquids_are_refused(name: str) -> None:
    with pytest.raises(AmbiguousName, match="several liquids") as caught:
        resolve(name)
    allowed = caught.value.allowed.split(", ")
    assert len(allowed) >= 2
    assert set(caught.value.choices) <= set(allowed)


def test_every_name_in_the_index_resolves_to_its_record() -> None:
    names = records.index()
    assert names
    for name, key in names.items():
        assert resolve(name) == key
    for key, entry in records.summaries().items():
        for name in (key, entry["name"], *entry["synonyms"], *filter(None, [entry["cas"]])):
            assert resolve(name) == key
            assert resolve(name.upper()) == key


def test_cas_numbers_have_a_right_check_digit() -> None:
    checked = 0
    for entry in records.summaries().values():
        if entry["cas"]:
            digits = [int(digit) for digit in entry["cas"] if digit != "-"]
            *body, last = digits
            weighted = sum(place * digit for place, digit in enumerate(reversed(body), 1))
            assert weighted % 10 == last, entry["name"]
            checked += 1
    assert checked


@pytest.mark.parametrize(
    ("search", "keys"),
    [
        ("C3H8O", {"1-propanol", "2-propanol"}),
        ("c3h8o", {"1-propanol", "2-propanol"}),
        ("CH3CHOHCH3", {"1-propanol", "2-propanol"}),
        ("(CH3)2CO", {"acetone"}),
        ("64-17-5", {"ethanol"}),
        ("glycol", {"ethylene_glycol", "propylene_glycol"}),
        ("alcohol", {"methanol", "ethanol", "1-propanol", "2-propanol"}),
        ("alcohols", {"methanol", "ethanol", "1-propanol", "2-propanol"}),
        ("Alkane", {"n-heptane", "n-dodecane", "n-hexadecane"}),
    ],
)
def test_searches_of_the_trade(search: str, keys: set[str]) -> None:
    assert keys <= set(liquids(search).index)


def test_a_cas_number_finds_one_record() -> None:
    for key, entry in records.summaries().items():
        if entry["cas"]:
            assert list(liquids(entry["cas"]).index) == [key]


def test_families_are_those_of_the_records() -> None:
    assert {"alcohol", "water", "metal"} <= set(family_names())
    assert family_names() == sorted({entry["family"] for entry in records.summaries().values()})
