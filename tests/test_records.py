"""Records: the data folder, frozen records, seals, the index of names, the commands, threads."""

from __future__ import annotations

import copy
import dataclasses
import json
import os
import pickle
import subprocess
import sys
import tomllib
from pathlib import Path
from typing import Any

import made_up_records as made_up
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import records, sealing
from dropkit.errors import RecordError, UnknownName
from dropkit.provenance import Source
from dropkit.record_index import fold
from dropkit.record_rules import independent, publication
from dropkit.record_schema import read_liquid, read_pair, read_source
from dropkit.record_store import Store, seal_of
from dropkit.validity import Range


@pytest.fixture
def folder(tmp_path: Path) -> Path:
    return made_up.write(tmp_path / "data")


@pytest.fixture
def store(folder: Path, monkeypatch: pytest.MonkeyPatch) -> Store:
    """The made-up folder in the place of dropkit's own."""
    store = Store(str(folder))
    monkeypatch.setattr(records, "_STORE", store)
    return store


# Where the data are ------------------------------------------------------------------------


def test_the_real_folder_has_the_marker_and_a_version() -> None:
    assert (records.data_dir() / "dropkit-data.toml").is_file()
    assert records.data_version().count(".") == 2


def test_no_folder_is_said(monkeypatch: pytest.MonkeyPatch, tmp_path: Path) -> None:
    monkeypatch.setattr(records, "_STORE", None)
    monkeypatch.setattr(records, "__file__", str(tmp_path / "dropkit" / "records.py"))
    with pytest.raises(RecordError, match="data folder is missing"):
        records.data_dir()


def test_the_folder_inside_the_package_comes_first(
    monkeypatch: pytest.MonkeyPatch, tmp_path: Path
) -> None:
    monkeypatch.setattr(records, "__file__", str(tmp_path / "dropkit" / "records.py"))
    for folder in ("data", "dropkit/data"):
        (tmp_path / folder).mkdir(parents=True)
        monkeypatch.setattr(records, "_STORE", None)
        # A folder without the marker is somebody else's.
        before = tmp_path / "data" if folder == "dropkit/data" else None
        if before is None:
            with pytest.raises(RecordError):
                records.data_dir()
        else:
            assert records.data_dir() == before
        (tmp_path / folder / "dropkit-data.toml").write_text(made_up.MARKER)
        monkeypatch.setattr(records, "_STORE", None)
        assert records.data_dir() == tmp_path / folder
    assert records.data_version() == "0.0.1"


def test_another_format_is_refused(folder: Path) -> None:
    made_up.edit(folder, "dropkit-data.toml", "format = 1", "format = 2")
    with pytest.raises(RecordError, match="format 2"):
        Store(str(folder)).version()


# Records -----------------------------------------------------------------------------------


def test_a_liquid_is_read_whole(store: Store) -> None:
    alpha = records.liquid_record("alpha")
    assert (alpha.name, alpha.cas, alpha.formula, alpha.kind) == (
        "alpha",
        "11-23-4",
        "A2",
        "liquid",
    )
    assert alpha.molar_mass == 0.05
    assert (alpha.melting_point, alpha.boiling_point, alpha.critical_temperature) == (260, 380, 600)
    assert alpha.facts["flash_point"]["method"] == "closed cup"
    assert alpha.facts["hazards"]["notes"] == ("Invented.",)
    assert alpha.amphiphile is False
    assert list(alpha.properties) == [
        *("density", "viscosity", "surface_tension", "vapour_pressure", "heat_of_vaporisation"),
    ]
    (density,) = alpha.properties["density"]
    assert density.label == "liquids/alpha: density 1"
    assert density.form == "polynomial"
    assert density.parameters == {"coefficients": (1000.0, -0.5), "centre": 300.0}
    assert density.range == Range(260.0, 400.0)
    assert density.mixture_range == Range(250.0, 400.0)
    assert density.uncertainty == 0.001
    assert density.sources == ("Able1901", "Baker1902")
    assert density.second is not None
    assert density.second["worst"] == 0.0003
    assert density.left_out is not None
    assert density.left_out["how"] == "source Baker1902 left out"
    assert density.reasons == {"mixture_range_reason": "an invented extension"}
    assert density.points == ("liquids/Able1901",)
    assert [block.label for block in alpha.properties["viscosity"]] == [
        "liquids/alpha: viscosity 1",
        "liquids/alpha: viscosity 2",
    ]


def test_an_absolute_uncertainty_is_also_given_relative(store: Store) -> None:
    (block,) = records.liquid_record("alpha").properties["surface_tension"]
    assert block.uncertainty_absolute == 0.0005
    assert block.uncertainty == pytest.approx(0.0005 / 0.02576)


def test_grade_is_the_worst_of_three_and_none_where_one_is_missing(store: Store) -> None:
    assert records.liquid_record("alpha").grade == "single"
    assert records.liquid_record("beta").grade is None
    assert records.liquid_record("gamma").kind == "solute"


def test_a_pair_is_found_in_any_order(store: Store) -> None:
    pair = records.pair_record("beta", "alpha")
    assert pair is records.pair_record("alpha", "beta")
    assert pair is not None
    assert pair.components == ("alpha", "beta")
    (density,) = pair.properties["density"]
    assert density.label == "mixtures/alpha__beta: density 1"
    assert density.parameters["coefficients"] == ((1e-5, 1e-6), (2e-6,))
    assert density.parameters["fraction_range"] == (0.0, 1.0)
    assert records.pair_record("alpha", "gamma") is None


def test_a_source_is_read(store: Store) -> None:
    source = records.source("Able1901")
    assert str(source) == "Able A., invented paper, 1901 doi:10.0/able"
    assert records.source("Able1901") is source


@pytest.mark.parametrize(
    "key", ["alfa", "Alpha", "ALPHA", "", ".", "../liquids/alpha", "alpha\0", "liquids/alpha"]
)
def test_an_unknown_key_is_said(store: Store, key: str) -> None:
    with pytest.raises(UnknownName):
        records.liquid_record(key)
    with pytest.raises(UnknownName):
        records.source(key)
    assert records.pair_record(key, "beta") is None


def test_unknown_key_names_the_nearest(store: Store) -> None:
    with pytest.raises(UnknownName, match="Did you mean 'alpha'"):
        records.liquid_record("alfa")
    with pytest.raises(UnknownName, match="Did you mean 'Able1901'"):
        records.source("Able1902")


def test_records_are_read_once_and_cannot_be_changed(store: Store) -> None:
    alpha = records.liquid_record("alpha")
    assert records.liquid_record("alpha") is alpha
    with pytest.raises(dataclasses.FrozenInstanceError):
        alpha.name = "omega"  # type: ignore[misc] # the point of the test
    table: Any = alpha.facts
    with pytest.raises(TypeError):
        table["molar_mass"] = 1
    with pytest.raises(TypeError):
        table["molar_mass"]["value"] = 1
    parameters: Any = alpha.properties["density"][0].parameters
    with pytest.raises(TypeError):
        parameters["coefficients"][0] = 1.0


@pytest.mark.parametrize("protocol", range(2, pickle.HIGHEST_PROTOCOL + 1))
def test_records_survive_pickling(store: Store, protocol: int) -> None:
    for record in (
        records.liquid_record("alpha"),
        records.pair_record("alpha", "beta"),
        records.source("Able1901"),
    ):
        again = pickle.loads(pickle.dumps(record, protocol))
        assert again == record
        assert hash(again) == hash(record)
        assert repr(again) == repr(record)
        assert copy.deepcopy(record) == record


def test_a_pickled_record_opens_in_a_fresh_process(store: Store) -> None:
    data = pickle.dumps(records.liquid_record("alpha"))
    code = (
        "import pickle, sys; record = pickle.loads(sys.stdin.buffer.read());"
        "print(record.name, record.properties['density'][0].parameters['coefficients'])"
    )
    done = subprocess.run([sys.executable, "-c", code], input=data, capture_output=True, check=True)
    assert done.stdout.decode().split() == ["alpha", "(1000.0,", "-0.5)"]


# The format --------------------------------------------------------------------------------

BROKEN = [
    ('name = "alpha"', "", "name: is missing"),
    ('name = "alpha"', "name = 3", "name: is 3"),
    ('family = "invented"', 'familly = "x"', r"familly: is not known here.*'family'"),
    ("[molar_mass]\nvalue = 0.0500", "[molar_mass]\nvalue = 50", r"molar_mass: is 50.*kg/mol"),
    ("[molar_mass]", "[molar_mas]", r"molar_mas: is not known here.*'molar_mass'"),
    ('value = 0.0500\nsource = "Able1901"', "value = 0.05", "molar_mass: source: is missing"),
    ('method = "closed cup"', "", "flash_point: method: is missing"),
    ('notes = ["Invented."]', 'notes = "Invented."', "hazards: notes"),
    ("value = 260.0", "value = -3.0", "melting_point: value: is -3.0"),
    ("value = 260.0", "value = true", "melting_point: value: is True"),
    ("[[density]]", "[density]", r"density: is not a list of blocks.*\[\[density\]\]"),
    (", value = 1000.1", ", value = 0", "check 1: value: is 0"),
    ("[[density]]", "density = []\n[[x]]", "not known here"),
    ("[[density]]", "[[densty]]", r"densty: is not known here.*'density'"),
    ("range = [260.0, 400.0]", "range = [400.0, 260.0]", "range: runs from 400 to 260"),
    ("range = [260.0, 400.0]", "range = [260.0]", "range: is "),
    ("mixture_range = [250.0, 400.0]", "mixture_range = [270.0, 400.0]", "mixture_range: is 270"),
    ("uncertainty = 0.001", "", "density 1: uncertainty: is missing"),
    ("uncertainty = 0.001", "uncertainty = 50", "density 1: uncertainty: is 50"),
    ("uncertainty = 0.001", "uncertainty = 0", "density 1: uncertainty: is 0"),
    ("uncertainty = 0.001", "uncertainty = nan", "density 1: uncertainty: is nan"),
    ('grade = "measured"', 'grade = "mesured"', "'mesured'.*Did you mean 'measured'"),
    ('sources = ["Able1901", "Baker1902"]', "sources = []", "sources: is missing.*no source"),
    ('sources = ["Able1901", "Baker1902"]', 'sources = "Able1901"', "sources: is 'Able1901'"),
    ('place = "Table 1"', "", "place: is missing"),
    ('obtained = "fitted here to 3 points"', 'obtained = " "', "obtained: is ' '"),
    ("checks = [{ T = 300.0, value = 1000.1", "chekcs = [{ T = 300.0, value = 1000.1", "no check"),
    ("checks = [{ T = 300.0,", "checks = [{ T = 420.0,", "check 1: T: is 420 K"),
    (", tolerance = 0.001 }]", ", tolerance = 0 }]", "check 1: tolerance: is 0"),
    ('source = "Cook1903", place', "place", "check 1: source: is missing"),
    ("checks = [{ T = 300.0,", "checks = [{ T = 300.0, p = 1,", "check 1: p: is not known"),
    ("median = 0.0001, ", "", "second: median: is missing"),
    ('how = "source Baker1902 left out", ', "how = 3, ", "left_out: how: is 3"),
]


@pytest.mark.parametrize(
    ("stated", "expected"),
    [
        ("uncertainty = 0.001", 0.002),
        ("uncertainty = 0.001\nuncertainty_absolute = 3.0", 6.0 / 1000.1),
        ("uncertainty_absolute = 3.0", 6.0 / 1000.1),
    ],
)
def test_what_a_block_may_leave_out(folder: Path, stated: str, expected: float) -> None:
    name = "liquids/alpha.toml"
    made_up.edit(folder, name, "uncertainty = 0.001", stated)
    made_up.edit(folder, name, ', place = "Table 2", tolerance = 0.001 }]', " }]")
    made_up.edit(folder, name, 'obtained = "fitted here to 3 points"\n', "")
    made_up.edit(folder, name, 'how = "source Baker1902 left out", ', "")
    made_up.edit(folder, name, '["liquids/Able1901"]', '["Able1901", "mixtures/Able1901"]')
    made_up.reseal(folder, name)
    density = Store(str(folder)).liquid("alpha").properties["density"][0]
    assert density.obtained == "as published"
    assert density.left_out is not None
    assert density.left_out["how"] == "every fifth point"
    assert density.points == ("liquids/Able1901", "mixtures/Able1901")
    assert density.checks[0]["tolerance"] == pytest.approx(expected, rel=1e-12)


@pytest.mark.parametrize(("old", "new", "message"), BROKEN)
def test_a_broken_file_names_file_key_and_command(
    folder: Path, old: str, new: str, message: str
) -> None:
    made_up.edit(folder, "liquids/alpha.toml", old, new)
    made_up.reseal(folder, "liquids/alpha.toml")
    with pytest.raises(RecordError, match=message) as caught:
        Store(str(folder)).liquid("alpha")
    assert str(caught.value).startswith("data/liquids/alpha.toml: ")
    assert "python -m dropkit.records seal liquids/alpha" in str(caught.value)
    # The command refuses it too, and leaves the file as it is.
    before = (folder / "liquids/alpha.toml").read_bytes()
    assert sealing.main(["seal", "alpha"], root=folder) == 1
    assert (folder / "liquids/alpha.toml").read_bytes() == before


@pytest.mark.parametrize(
    ("old", "new", "message"),
    [
        ('components = ["alpha", "beta"]', 'components = ["beta", "alpha"]', "alphabetical"),
        ('components = ["alpha", "beta"]', 'components = ["alpha", "gamma"]', "file's name"),
        ("fraction_range = [0.0, 1.0]", "", "fraction_range"),
        ("fraction_range = [0.0, 1.0]", "fraction_range = [0.0, 40]", "ends at 40"),
        ("fraction = 0.5", "fraction = 50", "check 1: fraction: is 50"),
        ("[[density]]", 'name = "x"\n[[density]]', "name: is not known here"),
    ],
)
def test_a_broken_pair_names_file_key_and_command(
    folder: Path, old: str, new: str, message: str
) -> None:
    name = "mixtures/alpha__beta.toml"
    made_up.edit(folder, name, old, new)
    made_up.reseal(folder, name)
    with pytest.raises(RecordError, match=message) as caught:
        Store(str(folder)).pair("alpha", "beta")
    assert "python -m dropkit.records seal mixtures/alpha__beta" in str(caught.value)


def places(value: Any, path: tuple[Any, ...] = ()) -> list[tuple[Any, ...]]:
    """The path to every value inside parsed data."""
    items: Any = value.items() if isinstance(value, dict) else enumerate(value)
    found = []
    for key, inner in items:
        found.append((*path, key))
        if isinstance(inner, (dict, list)):
            found.extend(places(inner, (*path, key)))
    return found


toml_values = st.recursive(
    st.one_of(st.booleans(), st.integers(), st.floats(), st.text(max_size=5), st.dates()),
    lambda inner: st.lists(inner, max_size=3) | st.dictionaries(st.text(max_size=5), inner),
    max_leaves=5,
)


@pytest.mark.parametrize(
    ("read", "stem", "text"),
    [
        (read_liquid, "alpha", made_up.ALPHA),
        (read_pair, "alpha__beta", made_up.ALPHA_BETA),
        (read_source, "CookCopy", made_up.SOURCES["CookCopy"]),
    ],
)
@given(data=st.data())
def test_whatever_a_file_holds_only_a_record_error_comes(
    read: Any, stem: str, text: str, data: st.DataObject
) -> None:
    content = tomllib.loads(text)
    *path, last = data.draw(st.sampled_from(places(content)))
    inside: Any = content
    for key in path:
        inside = inside[key]
    if data.draw(st.booleans()):
        inside[last] = data.draw(toml_values)
    else:
        del inside[last]
    try:
        record = read(stem, content)
    except RecordError as error:
        record = None
        name = str(error).split(": ")[0]
        assert name.startswith("data/")  # the error is the second good outcome
    if record is not None and not isinstance(record, Source):
        assert pickle.loads(pickle.dumps(record)) is not None
        assert all(
            block.uncertainty > 0 and block.sources and block.checks
            for blocks in record.properties.values()
            for block in blocks
        )


@pytest.mark.parametrize("content", [b"name = ", b"\xff\xfe", b'name = "a"\nname = "b"'])
def test_an_unreadable_file_is_said(folder: Path, content: bytes) -> None:
    (folder / "liquids/alpha.toml").write_bytes(content)
    with pytest.raises(RecordError, match=r"data/liquids/alpha.toml is unreadable: .*check"):
        Store(str(folder)).liquid("alpha")


# Seals -------------------------------------------------------------------------------------


def test_a_changed_number_breaks_the_seal(folder: Path) -> None:
    made_up.edit(folder, "liquids/alpha.toml", "-0.50]", "-0.51]")
    with pytest.raises(RecordError) as caught:
        Store(str(folder)).liquid("alpha")
    message = str(caught.value)
    assert "data/liquids/alpha.toml has changed since it was sealed" in message
    assert "python -m dropkit.records seal liquids/alpha" in message
    assert Store(str(folder)).liquid("beta").name == "beta"


def test_a_changed_pair_breaks_the_seal(folder: Path) -> None:
    made_up.edit(folder, "mixtures/alpha__beta.toml", "[[0.5, -0.2]]", "[[0.5, -0.3]]")
    with pytest.raises(RecordError, match="seal mixtures/alpha__beta"):
        Store(str(folder)).pair("alpha", "beta")


def test_a_changed_comment_does_not_break_the_seal(folder: Path) -> None:
    made_up.edit(folder, "liquids/alpha.toml", "# An invented liquid.", "# An invented fluid.\n\n")
    assert Store(str(folder)).liquid("alpha").name == "alpha"


def test_an_unsealed_file_is_refused(folder: Path) -> None:
    seal = Store(str(folder)).sealed("liquids", "alpha")["seal"]
    made_up.edit(folder, "liquids/alpha.toml", f'seal = "{seal}"\n', "")
    with pytest.raises(RecordError, match="is not sealed"):
        Store(str(folder)).liquid("alpha")


def test_sealing_changes_the_seal_line_only(tmp_path: Path) -> None:
    folder = made_up.write(tmp_path, seal=False)
    before = {path: path.read_bytes() for path in sorted(folder.rglob("*.toml"))}
    assert sealing.main(["seal"], root=folder) == 0
    for path, content in before.items():
        now = path.read_bytes()
        lines = [line for line in now.splitlines() if not line.startswith(b'seal = "')]
        assert lines == [line for line in content.splitlines() if line != b'seal = ""']
        if path.parent.name in ("liquids", "mixtures"):
            assert tomllib.loads(now.decode())["seal"] == seal_of(tomllib.loads(content.decode()))
        else:
            assert now == content


def test_sealing_twice_writes_nothing(folder: Path) -> None:
    before = {path: path.stat().st_mtime_ns for path in folder.rglob("*.*")}
    assert sealing.main(["seal"], root=folder) == 0
    assert {path: path.stat().st_mtime_ns for path in folder.rglob("*.*")} == before


@pytest.mark.skipif(os.name == "nt", reason="Windows has no such modes")
def test_sealing_keeps_the_mode_of_a_file(folder: Path) -> None:
    usual = (folder / "dropkit-data.toml").stat().st_mode
    assert (folder / "index.json").stat().st_mode == usual
    path = folder / "liquids/alpha.toml"
    path.chmod(0o640)
    made_up.edit(folder, "liquids/alpha.toml", "-0.50]", "-0.51]")
    assert sealing.main(["seal"], root=folder) == 0
    assert path.stat().st_mode & 0o777 == 0o640
    assert not list(folder.rglob("*.part"))


SEAL = "0" * 32


@pytest.mark.parametrize(
    ("text", "sealed"),
    [
        (
            'a = 1\nseal = "old"  # kept?\n[t]\nseal = 2\n',
            f'a = 1\nseal = "{SEAL}"\n[t]\nseal = 2\n',
        ),
        ("a = 1\n[t]\nseal = 2\n", f'a = 1\nseal = "{SEAL}"\n[t]\nseal = 2\n'),
        ("a = 1\n[[t]]\nb = 2\n", f'a = 1\nseal = "{SEAL}"\n[[t]]\nb = 2\n'),
        ("a = 1\r\n[t]\r\nb = 2\r\n", f'a = 1\r\nseal = "{SEAL}"\r\n[t]\r\nb = 2\r\n'),
        ("a = [\n[1],\n[2]]\n", f'seal = "{SEAL}"\na = [\n[1],\n[2]]\n'),
        (
            "a = 1\n\n# of t\n\n[t]\nb = 2\n",
            f'a = 1\nseal = "{SEAL}"\n\n# of t\n\n[t]\nb = 2\n',
        ),
        ("# x\n\n[t]\nb = 2\n", f'seal = "{SEAL}"\n# x\n\n[t]\nb = 2\n'),
        ("a = 1", f'seal = "{SEAL}"\na = 1'),
        ('a = """\nseal = "x"\n"""\n', f'seal = "{SEAL}"\na = """\nseal = "x"\n"""\n'),
    ],
)
def test_the_seal_line_finds_its_place(text: str, sealed: str) -> None:
    assert sealing.sealed_text(text, SEAL) == sealed
    assert sealing.sealed_text(sealed, SEAL) == sealed


@given(
    st.recursive(
        st.one_of(st.booleans(), st.integers(), st.floats(), st.text()),
        lambda inner: st.lists(inner) | st.dictionaries(st.text(), inner),
        max_leaves=10,
    ),
    st.text(),
)
def test_the_checksum_depends_on_values_not_on_order(value: Any, seal: str) -> None:
    data = {"a": 1.0, "b": value}
    turned = {"b": value, "seal": seal, "a": 1.0}
    assert seal_of(data) == seal_of(turned)
    assert seal_of(data) != seal_of({**data, "a": 1.0000000000000002})


# The index of names ------------------------------------------------------------------------


def test_the_index_holds_every_name(store: Store) -> None:
    names = records.index()
    for name in ("alpha", "Alpha liquid", "first-liquid", "FIRST_LIQUID", "11-23-4"):
        assert names[fold(name)] == "alpha"
    assert names[fold("bta")] == "beta"
    assert set(names.values()) == {"alpha", "beta", "gamma"}


def test_summaries_and_pairs_come_from_the_index(store: Store) -> None:
    entry = records.summaries()["alpha"]
    assert entry["cas"] == "11-23-4"
    assert entry["grade"] == "single"
    assert entry["properties"]["surface_tension"] == "reference"
    assert records.summaries()["gamma"]["kind"] == "solute"
    assert records.pairs() == {("alpha", "beta"): {"density": "measured", "viscosity": "single"}}
    assert store._liquids == {}
    names: Any = records.index()
    with pytest.raises(TypeError):
        names["alpha"] = "beta"


def test_a_file_that_the_index_lacks_is_found(folder: Path) -> None:
    text = made_up.GAMMA.replace("gamma", "delta").replace("99-99-9", "88-88-8")
    (folder / "liquids/delta.toml").write_text(text)
    store = Store(str(folder))
    assert store.index()["names"]["delta"] == "delta"


def test_a_file_that_is_gone_is_not_listed(folder: Path) -> None:
    (folder / "liquids/gamma.toml").unlink()
    assert "gamma" not in Store(str(folder)).index()["names"]


@pytest.mark.parametrize("content", [None, b"", b"{", b"[]", b"{}", b'{"liquids": 3}', b"\xff"])
def test_without_a_good_index_the_files_are_read(folder: Path, content: bytes | None) -> None:
    good = Store(str(folder)).index()
    if content is None:
        (folder / "index.json").unlink()
    else:
        (folder / "index.json").write_bytes(content)
    assert Store(str(folder)).index() == good


def test_names_the_other_way_round_are_not_believed(folder: Path) -> None:
    good = Store(str(folder)).index()
    turned = {**json.loads((folder / "index.json").read_bytes()), "names": dict(good["names"])}
    (folder / "index.json").write_text(json.dumps(turned))
    assert Store(str(folder)).index() == good


def test_a_broken_file_does_not_hide_the_others(folder: Path) -> None:
    (folder / "index.json").unlink()
    (folder / "liquids/alpha.toml").write_text("name = ")
    store = Store(str(folder))
    assert store.index()["names"]["bta"] == "beta"
    assert store.liquid("beta").name == "beta"
    # By the name of its file it is still found, and gives its own error.
    key = store.index()["names"]["alpha"]
    with pytest.raises(RecordError, match=r"alpha\.toml is unreadable"):
        store.liquid(key)


@pytest.mark.parametrize("name", ["BTA", "b-t-a", "beta", "44-32-1"])
def test_two_records_with_one_name_are_refused(folder: Path, name: str) -> None:
    made_up.edit(folder, "liquids/alpha.toml", '"first liquid"', f'"{name}"')
    (folder / "index.json").unlink()
    with pytest.raises(RecordError, match="two records with one name") as caught:
        Store(str(folder)).index()
    assert "liquids/alpha.toml" in str(caught.value)
    assert "liquids/beta.toml" in str(caught.value)


def test_an_ambiguous_name_is_no_synonym(folder: Path) -> None:
    made_up.edit(folder, "liquids/alpha.toml", '"first liquid"', '"Greek"')
    (folder / "index.json").unlink()
    with pytest.raises(RecordError, match="the name 'Greek' is ambiguous"):
        Store(str(folder)).index()


@given(st.text())
def test_folding_is_settled_after_one_pass(name: str) -> None:
    assert fold(fold(name)) == fold(name)


# The commands ------------------------------------------------------------------------------


def run(folder: Path, capsys: pytest.CaptureFixture[str], *arguments: str) -> tuple[int, str]:
    capsys.readouterr()
    status = sealing.main(arguments, root=folder)
    said = capsys.readouterr()
    return status, said.out + said.err


def test_check_is_content_with_a_sealed_folder(
    folder: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    assert run(folder, capsys, "check") == (0, "4 files: 4 unchanged, 0 problems\n")


def test_check_reports_and_writes_nothing(folder: Path, capsys: pytest.CaptureFixture[str]) -> None:
    made_up.edit(folder, "liquids/alpha.toml", "-0.50]", "-0.51]")
    made_up.edit(folder, "liquids/beta.toml", '"BTA"', '"BTB"')
    before = {path: path.read_bytes() for path in folder.rglob("*.*")}
    status, said = run(folder, capsys, "check")
    assert status == 1
    assert "liquids/alpha.toml has changed since it was sealed" in said
    assert "index.json does not match" in said
    assert {path: path.read_bytes() for path in folder.rglob("*.*")} == before


def test_seal_mends_what_check_reports(folder: Path, capsys: pytest.CaptureFixture[str]) -> None:
    made_up.edit(folder, "liquids/alpha.toml", "-0.50]", "-0.51]")
    status, said = run(folder, capsys, "seal", "alpha")
    assert (status, said) == (0, "1 files: 1 sealed, 0 unchanged, 0 problems\n")
    assert run(folder, capsys, "check")[0] == 0


@pytest.mark.parametrize(
    "name", ["alpha__beta", "mixtures/alpha__beta", "data/mixtures/alpha__beta.toml"]
)
def test_names_of_files_in_any_form(
    folder: Path, capsys: pytest.CaptureFixture[str], name: str
) -> None:
    assert run(folder, capsys, "check", name) == (0, "1 files: 1 unchanged, 0 problems\n")


def test_an_unknown_file_or_command_is_said(
    folder: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    status, said = run(folder, capsys, "check", "alfa")
    assert status == 1
    assert "alfa: no such file" in said
    assert "did you mean alpha?" in said
    assert run(folder, capsys, "chek")[0] == 2
    assert run(folder, capsys)[0] == 2


@pytest.mark.parametrize(
    ("file", "old", "new", "message"),
    [
        ("liquids/alpha", '"Cook1903", points', '"Cook1904", points', "Cook1904.toml; did you"),
        ("liquids/alpha", '["Able1901", "Baker1902"]', '["Nobody1", "Baker1902"]', "Nobody1.toml"),
        (
            "liquids/alpha",
            'method = "closed cup"\nsource = "Able1901"',
            'method = "x"\nsource = "N"',
            "flash_point: there is no",
        ),
        (
            "liquids/alpha",
            'points = ["liquids/Able1901"]',
            'points = ["liquids/x"]',
            "published/x|liquids/x.csv",
        ),
        (
            "liquids/alpha",
            'second = { source = "Cook1903"',
            'note = "x"\n#',
            "needs an independent check",
        ),
        (
            "liquids/alpha",
            '["Able1901", "Baker1902"]',
            '["Cook1903", "CookCopy"]',
            "two independent",
        ),
        (
            "liquids/alpha",
            'source = "Cook1903", place = "Table 1"',
            'source = "Able1901"',
            "'reference' needs",
        ),
        ("liquids/alpha", "uncertainty = 0.05", "uncertainty = 0.04", "'recalled' needs"),
        ("liquids/alpha", 'grade = "recalled"', 'grade = "single"', "from memory"),
        ("liquids/alpha", 'grade = "single"', 'grade = "estimated"', "never estimated"),
        (
            "liquids/alpha",
            'uncertainty = 0.05\ngrade = "recalled"',
            'uncertainty = 0.04\ngrade = "estimated"',
            "'estimated' needs an uncertainty",
        ),
        ("liquids/alpha", 'grade = "recalled"', 'grade = "own"', "for results"),
        (
            "mixtures/alpha__beta",
            'second = { source = "Baker1902"',
            'second = { source = "Able1901"',
            "two independent",
        ),
    ],
)
def test_rules_are_enforced(
    folder: Path,
    capsys: pytest.CaptureFixture[str],
    file: str,
    old: str,
    new: str,
    message: str,
) -> None:
    made_up.edit(folder, f"{file}.toml", old, new)
    for command in ("seal", "check"):
        status, said = run(folder, capsys, command, file)
        assert status == 1
        assert any(part in said for part in message.split("|")), said
        assert f"data/{file}.toml: " in said


def test_a_pair_needs_its_components(folder: Path, capsys: pytest.CaptureFixture[str]) -> None:
    (folder / "liquids/beta.toml").unlink()
    status, said = run(folder, capsys, "check", "alpha__beta")
    assert status == 1
    assert "components: there is no data/liquids/beta.toml" in said


def test_one_bad_file_does_not_stop_the_others(
    folder: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    (folder / "liquids/alpha.toml").write_text("name = ")
    made_up.edit(folder, "liquids/beta.toml", '"BTA"', '"BTB"')
    status, said = run(folder, capsys, "seal")
    assert status == 1
    assert "alpha.toml is unreadable" in said
    assert Store(str(folder)).liquid("beta").synonyms == ("BTB",)
    assert Store(str(folder)).index()["names"]["btb"] == "beta"


def test_two_records_with_one_name_stop_the_index(
    folder: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    before = (folder / "index.json").read_bytes()
    made_up.edit(folder, "liquids/alpha.toml", '"first liquid"', '"BTA"')
    status, said = run(folder, capsys, "seal")
    assert status == 1
    assert "two records with one name" in said
    assert (folder / "index.json").read_bytes() == before


def test_the_command_line_runs() -> None:
    done = subprocess.run(
        [sys.executable, "-m", "dropkit.records", "chek"], capture_output=True, text=True
    )
    assert done.returncode == 2
    assert "usage: python -m dropkit.records seal|check" in done.stderr


def test_independent_sources_are_counted(store: Store) -> None:
    count = lambda *keys: len(independent(store, keys))  # noqa: E731 # a local abbreviation
    assert count("Able1901", "Baker1902", "Cook1903") == 3
    assert count("Cook1903", "CookCopy") == 1
    assert count("CookCopy", "Cook1903", "Able1901") == 2
    # Parts of one publication, also where there is no such file.
    assert count("Able1901", "Able1901_alcohols", "Able1901_rest") == 1
    assert publication("Able1901_alcohols") == "Able1901"
    made_up.edit(Path(store.root), "sources/Baker1902.toml", 'doi = ""', 'doi = "10.0/ABLE"')
    assert count("Able1901", "Baker1902") == 1


# Cold start --------------------------------------------------------------------------------

COLD_START = """
import sys, threading
from concurrent.futures import ThreadPoolExecutor
from dropkit import records

records._STORE = records.Store(sys.argv[1])
gate = threading.Barrier(16)

def work(number):
    gate.wait()
    from dropkit.properties.equations import FORMS
    alpha = records.liquid_record("alpha")
    pair = records.pair_record("beta", "alpha")
    block = alpha.properties["viscosity"][0]
    value = FORMS[block.form].scalar(block.parameters)(300.0)
    key = records.index()["firstliquid"]
    return id(alpha), id(pair), id(records.index()), id(records.source("Able1901")), id(records.ambiguous_names()), value, key

with ThreadPoolExecutor(16) as pool:
    found = set(pool.map(work, range(16)))
assert len(found) == 1, found
print(*found.pop()[5:])
"""


def test_sixteen_threads_at_a_cold_start_get_one_record(folder: Path) -> None:
    done = subprocess.run(
        [sys.executable, "-c", COLD_START, str(folder)], capture_output=True, text=True
    )
    assert done.returncode == 0, done.stderr
    value, key = done.stdout.split()
    # exp(-4 + 500/150), by hand
    assert float(value) == pytest.approx(0.513417119, rel=1e-8)
    assert key == "alpha"


def test_a_look_up_loads_nothing_heavy(folder: Path) -> None:
    code = (
        "import sys; from dropkit import records; records._STORE = records.Store(sys.argv[1]);"
        "records.liquid_record(records.index()['alpha']);"
        "print(sorted({'pandas', 'pint', 'scipy', 'CoolProp', 'thermo', 'pathlib'} "
        "& set(sys.modules)))"
    )
    environment = {name: value for name, value in os.environ.items() if "COV" not in name}
    done = subprocess.run(
        [sys.executable, "-c", code, str(folder)],
        capture_output=True,
        text=True,
        check=True,
        env=environment,
    )
    assert done.stdout.strip() == "[]"
