"""Records of two liquids in contact: good invented ones pass every check, broken ones fail."""

from __future__ import annotations

import re
from collections.abc import Callable
from pathlib import Path

import made_up_records as made_up
import pytest
import record_checks as checks

from dropkit import sealing
from dropkit.errors import RecordError

CONTACT = "interfaces/alpha__beta"
RECORD = """components = ["alpha", "beta"]

[[interfacial_tension]]
form = "polynomial"
coefficients = [0.030, -0.0001]
centre = 300.0
range = [290.0, 310.0]
uncertainty = 0.02
grade = "measured"
sources = ["Able1901"]
place = "Table 7"
obtained = "fitted here to 2 points"
second = { source = "Baker1902", points = 1, median = 0.01, worst = 0.01 }
left_out = { how = "each point in turn", median = 0.01 }
checks = [{ T = 300.0, value = 0.0301, source = "Able1901", tolerance = 0.04 }]
points = ["interfaces/Able1901"]

[[interfacial_tension]]
form = "constant"
value = 0.0288
range = [305.0, 320.0]
uncertainty = 0.05
grade = "recalled"
sources = ["Recalled"]
place = "nowhere"
obtained = "as remembered"
checks = [{ T = 310.0, value = 0.0288, source = "Recalled", tolerance = 0.1 }]
"""
PUBLISHED = (
    "# source: Able A., invented paper, 1901\n# seen: invented\n# uncertainty: none\n"
    "liquid_1,liquid_2,T_K,value,doi\n"
    "alpha,beta,300.0,0.0301,\nalpha,beta,310.0,0.5,10.0/able\n"
)
EXCLUDED = 'interfaces/Able1901,alpha,beta,interfacial_tension,310,,0.5,"a slip",Cook1903\n'


@pytest.fixture
def folder(tmp_path: Path) -> Path:
    root = made_up.write(tmp_path / "data", seal=False)
    for name, text in (
        (CONTACT + ".toml", RECORD),
        ("published/interfaces/Able1901.csv", PUBLISHED),
    ):
        (root / name).parent.mkdir(parents=True)
        (root / name).write_text(text, encoding="utf-8")
    with (root / "published/excluded.csv").open("a", encoding="utf-8") as listed:
        listed.write(EXCLUDED)
    assert sealing.main(["seal"], root=root) == 0
    return root


@pytest.mark.parametrize("check", checks.RECORD_CHECKS, ids=lambda check: check.__name__)
def test_a_good_interface_passes(folder: Path, check: Callable[..., list[str]]) -> None:
    opened = checks.Folder(folder)
    assert opened.names()[-1] == CONTACT
    assert check(opened, CONTACT, opened.record(CONTACT)) == []


def test_good_points_and_exclusions_pass(folder: Path) -> None:
    opened = checks.Folder(folder)
    assert "interfaces/Able1901" in opened.published()
    assert checks.published(opened, "interfaces/Able1901") == []
    assert checks.excluded(opened) == []


@pytest.mark.parametrize(
    ("check", "old", "new", "message"),
    [
        (checks.earned, 'grade = "measured"', 'grade = "estimated"', "never estimated"),
        (checks.earned, 'sources = ["Able1901"]', 'sources = ["Abel1901"]', "no data/sources/Abel"),
        (checks.earned, 'grade = "recalled"', 'grade = "single"', "from memory"),
        (checks.points, '["interfaces/Able1901"]', '["liquids/Able1901"]', "no such points"),
        (checks.equations, 'form = "constant"', 'form = "steady"', "'steady' is not known"),
        (checks.check_points, "value = 0.0301,", "value = 0.0320,", "6.25% off"),
        (checks.tolerances, "tolerance = 0.04", "tolerance = 0.05", "5.00%, twice"),
        (checks.sane, "[0.030, -0.0001]", "[0.030, -0.004]", "no value above zero"),
        (checks.joins, "value = 0.0288\n", "value = 0.0388\n", "interfacial_tension 1 and"),
    ],
)
def test_a_broken_interface_fails(
    folder: Path, check: Callable[..., list[str]], old: str, new: str, message: str
) -> None:
    made_up.edit(folder, f"{CONTACT}.toml", old, new)
    made_up.reseal(folder, f"{CONTACT}.toml")
    opened = checks.Folder(folder)
    found = check(opened, CONTACT, opened.record(CONTACT))
    assert any(re.search(message, problem) for problem in found), found


@pytest.mark.parametrize(
    ("old", "new", "message"),
    [
        ('["alpha", "beta"]', '["beta", "alpha"]', "alphabetical"),
        ('["alpha", "beta"]', '["alpha", "delta"]', "those of the file's name"),
        ("[[interfacial_tension]]", "[[surface_tension]]", "surface_tension: is not known here"),
        ("range = [290.0, 310.0]", "range = [310.0, 290.0]", "rising"),
        (
            "range = [290.0, 310.0]",
            "range = [290.0, 310.0]\nmixture_range = [280.0, 320.0]",
            "interfacial_tension 1: mixture_range: means nothing",
        ),
        ("T = 300.0", "fraction = 0.5, T = 300.0", "fraction: is not known here"),
    ],
)
def test_a_file_of_another_form_is_refused(folder: Path, old: str, new: str, message: str) -> None:
    made_up.edit(folder, f"{CONTACT}.toml", old, new)
    made_up.reseal(folder, f"{CONTACT}.toml")
    with pytest.raises(RecordError, match=message):
        checks.Folder(folder).record(CONTACT)


def test_a_file_without_its_property_is_refused(folder: Path) -> None:
    (folder / f"{CONTACT}.toml").write_text('components = ["alpha", "beta"]\n')
    made_up.reseal(folder, f"{CONTACT}.toml")
    with pytest.raises(RecordError, match="interfacial_tension: is missing"):
        checks.Folder(folder).record(CONTACT)


def test_a_changed_file_is_refused_and_reported(
    folder: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    made_up.edit(folder, f"{CONTACT}.toml", "0.0288\n", "0.0289\n")
    with pytest.raises(RecordError, match=f"has changed .* seal {CONTACT}"):
        checks.Folder(folder).record(CONTACT)
    capsys.readouterr()
    assert sealing.main(["check", CONTACT], root=folder) == 1
    assert "has changed since it was sealed" in capsys.readouterr().err


@pytest.mark.parametrize(
    ("other", "message"),
    [("delta", "there is no data/liquids/delta.toml"), ("gamma", "gamma is a solute")],
)
def test_both_liquids_must_be_there(
    folder: Path, other: str, message: str, capsys: pytest.CaptureFixture[str]
) -> None:
    path = folder / f"interfaces/alpha__{other}.toml"
    path.write_text(RECORD.replace('"beta"', f'"{other}"'), encoding="utf-8")
    capsys.readouterr()
    assert sealing.main(["seal"], root=folder) == 1
    assert message in capsys.readouterr().err
    assert "seal =" not in path.read_text(encoding="utf-8")


def test_a_wrong_name_is_answered_with_the_folders(
    folder: Path, capsys: pytest.CaptureFixture[str]
) -> None:
    capsys.readouterr()
    assert sealing.main(["check", "interfaces/alpha__bet"], root=folder) == 1
    assert "no such file in data/liquids, data/mixtures, data/interfaces" in capsys.readouterr().err


@pytest.mark.parametrize(
    ("old", "new", "message"),
    [
        ("liquid_1,liquid_2", "a,b", "needs rows with the columns liquid_1,liquid_2"),
        ("alpha,beta,300.0", "beta,alpha,300.0", "row 1: .*alphabetical"),
        ("alpha,beta,300.0", "alpha,bet,300.0", "row 1: there is no liquid 'bet'"),
        ("0.0301,", "30.1,", "row 1: value is '30.1'"),
        ("300.0", "20.0", "row 1: T_K is '20.0'"),
    ],
)
def test_broken_points_fail(folder: Path, old: str, new: str, message: str) -> None:
    made_up.edit(folder, "published/interfaces/Able1901.csv", old, new)
    found = checks.published(checks.Folder(folder), "interfaces/Able1901")
    assert any(re.search(message, problem) for problem in found), found


@pytest.mark.parametrize("old", ["310,,0.5", "alpha,beta,interfacial_tension"])
def test_broken_exclusions_fail(folder: Path, old: str) -> None:
    new = {"310,,0.5": "310,,0.6"}.get(old, "alpha,beta,surface_tension")
    made_up.edit(folder, "published/excluded.csv", old, new)
    found = checks.excluded(checks.Folder(folder))
    assert any("row 3: no such row" in problem for problem in found), found
