"""Natural breakup lengths against closed values and measured lengths of six studies.

Marks: [C] computed elsewhere from the closed formula; [S2] measured, as someone else transcribed it.
Statistics of the whole set stand in docs/jets.md; they are asserted here, so that the page stays true.
"""

from __future__ import annotations

import math

import numpy as np
import pytest

from dropkit.errors import OutOfRange
from dropkit.models import jet
from dropkit.published_rows import published_file
from dropkit.records import data_dir

STUDIES = ("Arai1985", "AssetBales1951", "Grant1965", "Mansour1994", "Phinney1970", "Sterling1969")


def rows(study: str, regime: str = "Rayleigh") -> dict[str, np.ndarray]:
    """We, Oh (on the diameter) and L/d of one study's rows of one regime."""
    found = published_file(data_dir() / "published" / "jets" / f"{study}.csv")
    kept = [row for row in found if row["regime"] == regime]
    weber = np.array([float(row["We_d"]) for row in kept])
    reynolds = np.array([float(row["Re_d"]) for row in kept])
    length = np.array([float(row["breakup_length_over_d"]) for row in kept])
    return {"weber": weber, "ohnesorge": np.sqrt(weber) / reynolds, "length": length}


def jet_with(weber: np.ndarray, ohnesorge: np.ndarray) -> tuple[object, ...]:
    """A jet of unit density, surface tension and diameter that has these numbers."""
    return 1.0, ohnesorge, 1.0, np.sqrt(weber), 1.0


def log_ratios(study: str, regime: str = "Rayleigh") -> np.ndarray:
    """ln(measured over natural_breakup_length)."""
    found = rows(study, regime)
    model = jet.natural_breakup_length(
        *jet_with(found["weber"], found["ohnesorge"]), outside="allow"
    )
    return np.log(found["length"] / model.length)


LOGS = {study: log_ratios(study) for study in STUDIES}


# --- natural -------------------------------------------------------------------------------
def test_natural_is_webers_growth_with_a_fixed_logarithm() -> None:
    liquid = (1085.0, 0.009, 0.062)
    growth = jet.maximum_growth_viscous_longwave(*liquid, 75e-6)
    found = jet.natural_breakup_length(*liquid, 12.0, 75e-6)
    assert found.length == pytest.approx(12.0 * 10.0 / growth, rel=1e-13)
    by_amplitude = jet.breakup_length_from_growth(12.0, 75e-6, growth, 37.5e-6 * math.exp(-10.0))
    assert found.length == pytest.approx(by_amplitude, rel=1e-12)
    assert found.high / found.length == pytest.approx(2.4)
    assert found.length / found.low == pytest.approx(2.4)
    own = jet.natural_breakup_length(*liquid, 12.0, 75e-6, constant=14.0)
    assert own.length == pytest.approx(1.4 * found.length)


def test_natural_holds_the_measured_lengths() -> None:
    """153 Rayleigh rows [S2]: the figures of docs/jets.md."""
    every = np.concatenate(list(LOGS.values()))
    assert every.size == 153
    assert np.exp(every.mean()) == pytest.approx(0.97, abs=0.005)
    assert np.sqrt((every**2).mean()) == pytest.approx(0.439, abs=0.001)
    assert np.count_nonzero(np.abs(every) > math.log(2.4)) == 1
    assert np.exp(np.abs(every).max()) == pytest.approx(2.53, abs=0.005)


@pytest.mark.parametrize(
    ("study", "count", "bias", "rms"),
    [
        ("Arai1985", 5, 1.44, 0.377),
        ("AssetBales1951", 4, 0.93, 0.268),
        ("Grant1965", 7, 1.06, 0.076),
        ("Mansour1994", 37, 0.87, 0.674),
        ("Phinney1970", 75, 0.87, 0.308),
        ("Sterling1969", 25, 1.40, 0.428),
    ],
)
def test_natural_study_by_study(study: str, count: int, bias: float, rms: float) -> None:
    logs = LOGS[study]
    assert logs.size == count
    assert np.exp(logs.mean()) == pytest.approx(bias, abs=0.01)
    assert np.sqrt((logs**2).mean()) == pytest.approx(rms, abs=0.001)
    assert np.mean(np.abs(logs) < math.log(2.4)) >= 0.96


def constant_without(left_out: str) -> float:
    """ln(C/10) from five studies, each counted the same."""
    return float(np.mean([logs.mean() for study, logs in LOGS.items() if study != left_out]))


def test_the_band_holds_a_study_that_was_left_out() -> None:
    """The promise: no wider than 2.5 either way, 90 % on average, 75 % of the worst study.

    The constant is made from the other five each time; the width, 2.4, is the shipped one, which
    was chosen with all six in sight (the next test says what that hides).
    """
    covered = {
        study: np.mean(np.abs(LOGS[study] - constant_without(study)) < math.log(2.4))
        for study in STUDIES
    }
    constants = [10.0 * math.exp(constant_without(study)) for study in STUDIES]
    assert min(constants) > 10.1
    assert max(constants) < 11.2
    assert np.mean(list(covered.values())) == pytest.approx(0.980, abs=0.001)
    worst = min(covered, key=lambda study: covered[study])
    assert worst == "Mansour1994"
    assert covered[worst] == pytest.approx(0.919, abs=0.001)
    assert covered["Sterling1969"] == pytest.approx(0.96, abs=0.001)
    assert all(covered[study] == 1.0 for study in set(STUDIES) - {worst, "Sterling1969"})


@pytest.mark.parametrize("left_out", STUDIES)
def test_the_width_of_the_band_from_five_studies(left_out: str) -> None:
    """Their 95 % quantile is too narrow for the sixth in one case; with it as a new study, too wide.

    A prediction interval (Student's t between the means of five studies, scatter within them)
    would be 2.7 to 4.8 wide: wider than the 2.5 that was asked for.
    """
    others = [LOGS[study] for study in STUDIES if study != left_out]
    middle = constant_without(left_out)
    quantile = np.quantile(np.abs(np.concatenate(others) - middle), 0.95)
    covered = np.mean(np.abs(LOGS[left_out] - middle) < quantile)
    if left_out == "Mansour1994":
        # The honest exception: nobody else's jets would have foretold these.
        assert covered == pytest.approx(0.22, abs=0.01)
        assert np.exp(quantile) == pytest.approx(1.73, abs=0.01)
    else:
        assert covered >= 0.96
        assert 2.1 < np.exp(quantile) < 2.4
    between = np.var([logs.mean() for logs in others], ddof=1)
    inner = np.concatenate([logs - logs.mean() for logs in others])
    within = (inner**2).sum() / (inner.size - 5)
    students_t = 2.776  # 97.5 %, 4 degrees of freedom
    wide = math.exp(students_t * math.sqrt(between * (1.0 + 1.0 / 5.0) + within))
    assert 2.7 < wide < 4.8
    assert np.mean(np.abs(LOGS[left_out] - middle) < math.log(min(wide, 2.5))) >= 0.97


def test_tubes_that_had_no_part_in_the_choice() -> None:
    """29 more Rayleigh rows of Grant 1965 [S2]; those of 88 % glycerol lie beyond the range."""
    found = rows("Grant1965_tables")
    case = jet_with(found["weber"], found["ohnesorge"])
    model = jet.natural_breakup_length(*case, outside="nan")
    inside = ~np.isnan(model.length)
    assert np.count_nonzero(inside) == 23
    ratio = found["length"][inside] / model.length[inside]
    assert np.exp(np.log(ratio).mean()) == pytest.approx(1.37, abs=0.01)
    assert np.sqrt((np.log(ratio) ** 2).mean()) == pytest.approx(0.366, abs=0.001)
    assert ratio.max() < 1.8
    assert ratio.min() > 0.95
    beyond = jet.natural_breakup_length(*case, outside="allow").length[~inside]
    ratio = found["length"][~inside] / beyond
    assert np.exp(np.log(ratio).mean()) == pytest.approx(0.96, abs=0.01)  # Oh 0.63


def test_other_regimes_are_not_natural_rayleigh_breakup() -> None:
    wind = np.concatenate(
        [log_ratios(s, "first wind-induced") for s in ("Phinney1970", "Sterling1969", "Grant1965")]
    )
    assert np.exp(wind.mean()) < 0.4  # the formula is far too long there


@pytest.mark.parametrize(
    "change", [{"velocity": 1e-2}, {"velocity": 1e3}, {"viscosity": 10.0}], ids=str
)
def test_natural_outside_what_was_measured(change: dict[str, float]) -> None:
    case = {"density": 1e3, "viscosity": 1e-3, "surface_tension": 0.07, "velocity": 5.0}
    with pytest.raises(OutOfRange, match=r"Weber|Ohnesorge"):
        jet.natural_breakup_length(**{**case, **change}, jet_diameter=1e-4)
    allowed = jet.natural_breakup_length(**{**case, **change}, jet_diameter=1e-4, outside="nan")
    assert np.isnan(allowed).all()


# --- Grant & Middleman -----------------------------------------------------------------------
def test_laminar_pipe_closed_value() -> None:
    # We^0.5 (1 + 3 Oh) = 13 gives 172.5386759 [C]
    ohnesorge = 0.08
    weber = (13.0 / (1.0 + 3.0 * ohnesorge)) ** 2
    found = jet.laminar_pipe_breakup_length(1.0, ohnesorge, 1.0, math.sqrt(weber), 1.0)
    assert found == pytest.approx(172.5386759, rel=1e-9)


WATER = (997.0, 0.91e-3, 0.0710)
GLYCOL = (1116.0, 17.9e-3, 0.0482)
GLYCEROL = (1190.0, 26e-3, 0.0645)


@pytest.mark.parametrize(
    ("liquid", "diameter", "velocity", "measured", "formula"),
    [  # Grant 1965, tables, A-4 [S2]; the last column is printed beside them [C]
        (WATER, 0.62e-3, 1.00, 47.4, 49),
        (WATER, 0.62e-3, 1.48, 78.3, 69),
        (GLYCOL, 1.37e-3, 1.8, 158, 163),
        (GLYCOL, 1.37e-3, 3.9, 293, 314),
        (GLYCOL, 1.37e-3, 5.9, 422, 447),
        (GLYCEROL, 1.37e-3, 2.5, 165, 201),
        (GLYCEROL, 1.37e-3, 5.5, 349, 394),
        (GLYCEROL, 1.37e-3, 7.4, 458, 507),
    ],
)
def test_laminar_pipe_against_grants_tables(
    liquid: tuple[float, float, float],
    diameter: float,
    velocity: float,
    measured: float,
    formula: float,
) -> None:
    found = jet.laminar_pipe_breakup_length(*liquid, velocity, diameter) / diameter
    assert found == pytest.approx(formula, abs=0.6)
    assert found == pytest.approx(measured, rel=0.25)


def test_laminar_pipe_exponent_is_on_the_whole_bracket() -> None:
    """The form with 0.85 on the viscous factor alone is biased against the author's own tables."""
    found = rows("Grant1965")
    bracket = np.sqrt(found["weber"]) * (1.0 + 3.0 * found["ohnesorge"])
    model = jet.laminar_pipe_breakup_length(*jet_with(found["weber"], found["ohnesorge"]))
    np.testing.assert_allclose(model, 19.5 * bracket**0.85, rtol=1e-12)
    logs = np.log(found["length"] / model)
    assert np.exp(logs.mean()) == pytest.approx(0.951, abs=0.001)
    assert np.sqrt((logs**2).mean()) == pytest.approx(0.094, abs=0.001)
    wrong = 19.5 * np.sqrt(found["weber"]) * (1.0 + 3.0 * found["ohnesorge"]) ** 0.85
    assert np.exp(np.mean(np.log(wrong / found["length"]))) > 1.49


def test_laminar_pipe_against_all_of_grants_tables() -> None:
    """36 Rayleigh rows of eleven tables [S2]; the promise is an rms of 0.12."""
    both = [rows("Grant1965"), rows("Grant1965_tables")]
    found = {key: np.concatenate([part[key] for part in both]) for key in both[0]}
    model = jet.laminar_pipe_breakup_length(*jet_with(found["weber"], found["ohnesorge"]))
    logs = np.log(found["length"] / model)
    assert logs.size == 36
    assert np.exp(logs.mean()) == pytest.approx(0.995, abs=0.001)
    assert np.sqrt((logs**2).mean()) == pytest.approx(0.103, abs=0.001)
    thin = found["ohnesorge"] < 0.3  # without the six of 88 % glycerol
    assert np.sqrt((logs[thin] ** 2).mean()) == pytest.approx(0.108, abs=0.001)


@pytest.mark.parametrize(
    ("study", "bias"),
    [
        ("Arai1985", 1.00),
        ("AssetBales1951", 0.68),
        ("Mansour1994", 0.61),
        ("Phinney1970", 0.67),
        ("Sterling1969", 1.15),
    ],
)
def test_laminar_pipe_against_other_laboratories(study: str, bias: float) -> None:
    found = rows(study)
    model = jet.laminar_pipe_breakup_length(
        *jet_with(found["weber"], found["ohnesorge"]), outside="allow"
    )
    assert np.exp(np.log(found["length"] / model).mean()) == pytest.approx(bias, abs=0.01)
