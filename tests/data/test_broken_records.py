"""The checks of data/ on made-up records: all pass on good ones, and each can fail."""

from __future__ import annotations

import re
from collections.abc import Callable
from pathlib import Path

import made_up_records as made_up
import pytest
import record_checks as checks

ALPHA, BETA, PAIR = "liquids/alpha", "liquids/beta", "mixtures/alpha__beta"


@pytest.fixture
def folder(tmp_path: Path) -> Path:
    return made_up.write(tmp_path / "data")


@pytest.mark.parametrize("check", checks.RECORD_CHECKS, ids=lambda check: check.__name__)
def test_good_records_pass(folder: Path, check: Callable[..., list[str]]) -> None:
    opened = checks.Folder(folder)
    assert opened.names() == [ALPHA, BETA, "liquids/gamma", PAIR]
    for name in opened.names():
        assert check(opened, name, opened.record(name)) == []


def test_good_points_pass(folder: Path) -> None:
    opened = checks.Folder(folder)
    for name in opened.published():
        assert checks.published(opened, name) == []
    assert checks.excluded(opened) == []


BROKEN: list[tuple[Callable[..., list[str]], str, str, str, str]] = [
    (checks.earned, ALPHA, '["Able1901", "Baker1902"]', '["Able1901", "Bak1902"]', "Bak1902"),
    (checks.earned, ALPHA, 'second = { source = "Cook1903"', 'note = "x" #', "independent check"),
    (checks.earned, ALPHA, '["Able1901", "Baker1902"]', '["Cook1903"]', "two independent"),
    (checks.earned, ALPHA, "uncertainty = 0.05", "uncertainty = 0.03", "recalled"),
    (checks.earned, ALPHA, 'grade = "recalled"', 'grade = "single"', "from memory"),
    (checks.earned, ALPHA, "value = 380.0", "value = 150.0", "own vapour pressure only"),
    (
        checks.earned,
        ALPHA,
        'source = "Cook1903", place = "Table 1"',
        'source = "Able1901"',
        "'reference' needs",
    ),
    (
        checks.archive_papers,
        PAIR,
        'sources = ["Able1901"]\nplace = "Table 9"\nobtained = "fitted here to 4 points"\n'
        'second = { source = "Baker1902"',
        'sources = ["ThermoMLArchive"]\nplace = "Table 9"\nobtained = "fitted here"\n'
        'second = { source = "ThermoMLArchive"',
        "'measured' on 0 paper",
    ),
    (checks.points, ALPHA, '"liquids/Able1901"]', '"mixtures/Able1901"]', "no such points"),
    (checks.equations, ALPHA, 'form = "vogel"', 'form = "vogle"', "'vogle' is not known"),
    (checks.equations, ALPHA, "centre = 300.0", "center = 300.0", "no parameter 'center'"),
    (checks.equations, PAIR, 'form = "redlich_kister"', 'form = "x"', "not known for a mixture"),
    (checks.equations, PAIR, 'basis = "mass"', 'note = "x"', "'basis' is missing"),
    (checks.equations, PAIR, 'basis = "mass"', 'basis = "mole"', "mixes by reciprocal on mole"),
    (checks.check_points, ALPHA, "value = 1000.1", "value = 1001.2", "0.12% off"),
    (checks.check_points, ALPHA, "[-4.0, 500.0, 150.0]", "[-4.1, 500.0, 150.0]", "viscosity 1"),
    (checks.check_points, PAIR, "value = 886.9", "value = 889", "mixtures/alpha__beta: density"),
    (checks.tolerances, PAIR, "tolerance = 0.001 },", "tolerance = 0.003 },", "0.30%, twice"),
    (checks.sane, ALPHA, "[1000.0, -0.50]", "[1000.0, -11.0]", "no value above zero at"),
    (checks.sane, ALPHA, "[-4.0, 500.0, 150.0]", "[-4.0, 500.0, 255.0]", "viscosity 1"),
    (checks.sane, ALPHA, "s0 = 0.06", "s0 = 60.0", "which no liquid does"),
    (checks.sane, PAIR, "[[1e-5, 1e-6], [2e-6]]", "[[-1e-2]]", "w = "),
    (
        checks.sane,
        ALPHA,
        "1.22\ncritical_temperature = 600.0",
        "1.22\ncritical_temperature = 300.0",
        "zero at",
    ),
    (checks.joins, ALPHA, "-0.66666, -0.022", "0.1, -0.022", "viscosity 1 and"),
    (checks.slopes, ALPHA, "[1000.0, -0.50]", "[1000.0, 0.50]", "density 1: rises"),
    (checks.slopes, ALPHA, "-0.66666, -0.022", "-0.66666, 0.022", "viscosity 2: rises"),
    (checks.slopes, ALPHA, "n = 1.22", "n = -1.22", "surface_tension 1: rises"),
    (checks.slopes, ALPHA, "9.4798714, 1700.0", "9.4798714, -1700.0", "vapour_pressure 1: falls"),
    (checks.slopes, ALPHA, "[651000.0, -100.0]", "[651000.0, 100.0]", "heat_of_vap.* 1: rises"),
    (checks.slopes, PAIR, "[[0.5, -0.2]]", "[[0.5, 20.0]]", "viscosity 1: rises.*w = "),
    (checks.temperatures, ALPHA, "value = 600.0", "value = 390.0", "passes the critical point"),
    (checks.temperatures, PAIR, "range = [260.0, 330.0]", "range = [260.0, 350.0]", "beta has no"),
    (checks.temperatures, PAIR, "range = [260.0, 400.0]", "range = [240.0, 400.0]", "alpha has no"),
    (
        checks.left_out,
        ALPHA,
        'obtained = "as published"',
        'obtained = "fitted here to 9 points"',
        "without left_out",
    ),
    (checks.boils, ALPHA, "value = 380.0", "value = 375.0", "at the boiling point"),
    (checks.clausius_clapeyron, ALPHA, "[651000.0,", "[851000.0,", "Clausius-Clapeyron"),
]


@pytest.mark.parametrize(
    ("check", "name", "old", "new", "message"),
    BROKEN,
    ids=[f"{row[0].__name__}-{i}" for i, row in enumerate(BROKEN)],
)
def test_a_broken_record_fails(
    folder: Path, check: Callable[..., list[str]], name: str, old: str, new: str, message: str
) -> None:
    made_up.edit(folder, f"{name}.toml", old, new)
    made_up.reseal(folder, f"{name}.toml")
    opened = checks.Folder(folder)
    found = check(opened, name, opened.record(name))
    assert found
    assert any(re.search(message, problem) for problem in found), found


def test_every_check_of_records_is_seen_to_fail() -> None:
    seen = {row[0] for row in BROKEN}
    # A scalar body that differs from its array body can't be written into a data file.
    assert seen | {checks.ends} == set(checks.RECORD_CHECKS)


def test_bodies_that_differ_are_seen(folder: Path, monkeypatch: pytest.MonkeyPatch) -> None:
    opened = checks.Folder(folder)
    monkeypatch.setattr(checks, "pure", lambda block, T: [1.0])
    assert len(checks.ends(opened, BETA, opened.record(BETA))) == 4


def test_a_stated_reason_lets_surface_tension_rise(folder: Path) -> None:
    made_up.edit(folder, f"{ALPHA}.toml", "n = 1.22", 'n = -1.22\nreason = "invented"')
    made_up.reseal(folder, f"{ALPHA}.toml")
    opened = checks.Folder(folder)
    assert checks.slopes(opened, ALPHA, opened.record(ALPHA)) == []


def test_water_may_be_densest_at_four_degrees(folder: Path) -> None:
    text = made_up.BETA.replace(
        "[800.0, -0.8]\ncentre = 300.0\nrange = [250.0, 400.0]",
        "[1000.0, 0.0, -0.008]\ncentre = 277.0\nrange = [270.0, 400.0]",
    )
    for name in ("beta", "water"):
        (folder / f"liquids/{name}.toml").write_text(text.replace('"beta"', f'"{name}"'))
        made_up.reseal(folder, f"liquids/{name}.toml")
    opened = checks.Folder(folder)
    water, beta = (
        checks.slopes(opened, name, opened.record(name)) for name in ("liquids/water", BETA)
    )
    assert water == []
    assert beta == ["liquids/beta: density 1: rises at 270 K"]


def test_two_papers_of_the_archive_are_enough(folder: Path) -> None:
    made_up.edit(folder, f"{PAIR}.toml", 'sources = ["Able1901"]', 'sources = ["ThermoMLArchive"]')
    made_up.edit(folder, f"{PAIR}.toml", '"Baker1902", points', '"ThermoMLArchive", points')
    made_up.edit(folder, f"{PAIR}.toml", "mixtures/Able1901", "mixtures/ThermoMLArchive")
    made_up.reseal(folder, f"{PAIR}.toml")
    file = folder / "published/mixtures/ThermoMLArchive.csv"
    text = made_up.PUBLISHED["mixtures/Able1901"]
    for doi, count in (("10.0/able", 1), ("10.0/cook", 0)):
        file.write_text(text.replace("887.0,\n", f"887.0,{doi}\n"))
        opened = checks.Folder(folder)
        assert len(checks.archive_papers(opened, PAIR, opened.record(PAIR))) == count


@pytest.mark.parametrize(
    ("name", "old", "new", "message"),
    [
        ("liquids/Able1901", "# seen: invented\n", "", "no line '# seen:'"),
        ("liquids/Able1901", "liquid,property", "Liquid,property", "needs rows with the columns"),
        ("liquids/Able1901", "alpha,density,320", "alfa,density,320", "row 2: .* no liquid 'alfa'"),
        ("liquids/Able1901", "alpha,density,320", "alpha,desnity,320", "row 2: property 'desnity'"),
        ("liquids/Able1901", "320", "46.85", "row 2: T_K is '46.85'"),
        ("liquids/Able1901", "990.1", "0.9901", "row 2: value is '0.9901'"),
        ("liquids/Able1901", "990.1", "", "row 2: value is ''"),
        ("liquids/Able1901", "990.1", "nan", "row 2: value is 'nan'"),
        ("liquids/Able1901", "990.1,", "990.1", "row 2: has another number of fields"),
        ("liquids/Able1901", "990.1,", "990.1,doi:10.0/able", "is no bare DOI"),
        ("mixtures/Able1901", "alpha,beta,mass", "beta,alpha,mass", "row 1: .*alphabetical"),
        ("mixtures/Able1901", "alpha,beta,mole", "alpha,beta,molar", "row 2: basis 'molar'"),
        ("mixtures/Able1901", "mass,0.5", "mass,50", "row 1: fraction_1 is '50'"),
    ],
)
def test_broken_points_fail(folder: Path, name: str, old: str, new: str, message: str) -> None:
    made_up.edit(folder, f"published/{name}.csv", old, new)
    found = checks.published(checks.Folder(folder), name)
    assert any(re.search(message, problem) for problem in found), found


def test_points_need_a_source(folder: Path) -> None:
    text = (folder / "published/liquids/Able1901.csv").read_text()
    (folder / "published/liquids/Dora1904_part.csv").write_text(text)
    (folder / "published/liquids/Able1901_part.csv").write_text(text)
    opened = checks.Folder(folder)
    assert checks.published(opened, "liquids/Dora1904_part") == [
        "published/liquids/Dora1904_part: there is no source Dora1904"
    ]
    assert checks.published(opened, "liquids/Able1901_part") == []


def test_an_exclusion_may_mean_a_whole_column(folder: Path) -> None:
    made_up.edit(folder, "published/excluded.csv", "300,0.5,850.0", ",0.5,")
    made_up.edit(folder, "published/excluded.csv", "400.0,,700.0", ",,")
    assert checks.excluded(checks.Folder(folder)) == []


@pytest.mark.parametrize(
    ("old", "new", "message"),
    [
        ("400.0,,700.0", "400.0,,701.0", "row 1: no such row"),
        ("400.0,,700.0", "401.0,,700.0", "row 1: no such row"),
        ("400.0,,700.0", "400.0,0.5,700.0", "row 1: no such row"),
        ("liquids/Able1901,alpha,", "liquids/Able1901,beta,", "row 1: no such row"),
        ("liquids/Able1901,alpha,", "liquids/Able1902,alpha,", "row 1: there is no published"),
        ("invented slip", "", "row 2: needs a reason"),
        ("300,0.5,850.0", "300,0.6,850.0", "row 2: no such row"),
        ("file,component_1", "files,component_1", "needs the columns"),
    ],
)
def test_broken_exclusions_fail(folder: Path, old: str, new: str, message: str) -> None:
    made_up.edit(folder, "published/excluded.csv", old, new)
    found = checks.excluded(checks.Folder(folder))
    assert any(re.search(message, problem) for problem in found), found
