"""The core of the stream: any sufficient set of facts gives the same design."""

from __future__ import annotations

import itertools
import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.design.stream_hole import HOLES, Hole, hole_kind
from dropkit.design.stream_roots import highest_root
from dropkit.design.stream_solver import FACTS, Liquid, choose, most_unstable_ratio, solve
from dropkit.errors import BadInput
from dropkit.models import jet

WATERY = Liquid(1060.0, 2.4e-3, 0.065)
DROP = math.pi / 6.0 * 110e-6**3


def everything(liquid, hole, volume, frequency):
    """All facts of the design at the most unstable wave."""
    solved = solve(liquid, {"drop_volume": volume, "frequency": frequency}, hole, 1)
    size, speed = float(np.exp(solved.size[0])), float(np.exp(solved.speed[0]))
    flow = 0.25 * math.pi * size * size * speed
    bore = float(solved.nozzle_diameter[0])
    three = (liquid.density, liquid.viscosity, liquid.surface_tension)
    return solved, {
        "drop_volume": volume,
        "frequency": frequency,
        "flow": flow,
        "velocity": speed,
        "jet_diameter": size,
        "wavelength_ratio": float(np.exp(solved.ratio[0])),
        "nozzle_diameter": bore,
        "gauge_pressure": float(hole.pressure(*three, flow, bore).total),
    }


SETS = [
    chosen
    for count in (2, 3)
    for chosen in itertools.combinations(FACTS, count)
    if len(choose(frozenset(chosen))) == 3
    and not {"jet_diameter", "nozzle_diameter"} <= set(chosen)
]


@pytest.mark.parametrize("kind", ["tube", "hole"])
@pytest.mark.parametrize("chosen", SETS, ids="-".join)
def test_any_sufficient_set_gives_the_same_design(chosen, kind):
    hole = Hole(HOLES[kind], length_ratio=HOLES[kind].length_ratio)
    solved, facts = everything(WATERY, hole, DROP, 64e3)
    again = solve(WATERY, {word: facts[word] for word in chosen}, hole, 1)
    # Where the wave is given and is not assumed, the same; all to 1e-9 of each quantity.
    assert again.size[0] == pytest.approx(solved.size[0], abs=1e-9)
    assert again.speed[0] == pytest.approx(solved.speed[0], abs=1e-9)
    assert again.ratio[0] == pytest.approx(solved.ratio[0], abs=1e-9)
    assert again.nozzle_diameter[0] == pytest.approx(solved.nozzle_diameter[0], rel=1e-9)


def test_there_are_many_sufficient_sets():
    assert len(SETS) > 50


@given(
    st.floats(1e-4, 1.0),
    st.floats(0.015, 0.5),
    st.floats(5e-6, 2e-3),
    st.floats(10.0, 1e4),
)
def test_pressure_and_hole_lead_back(viscosity, tension, diameter, weber):
    # Invariant: design forwards from drop and rate, then back from pressure, hole and rate.
    liquid = Liquid(1000.0, viscosity, tension)
    hole = Hole(HOLES["tube"])
    jet_diameter = diameter / 1.89
    speed = math.sqrt(weber * tension / (1000.0 * jet_diameter))
    _, facts = everything(liquid, hole, math.pi / 6 * diameter**3, speed / (4.5 * jet_diameter))
    back = solve(
        liquid, {w: facts[w] for w in ("gauge_pressure", "nozzle_diameter", "frequency")}, hole, 1
    )
    assert float(np.exp(back.size[0])) == pytest.approx(facts["jet_diameter"], rel=1e-8)
    assert float(np.exp(back.speed[0])) == pytest.approx(facts["velocity"], rel=1e-8)


def test_arrays_are_their_elements():
    hole = Hole(HOLES["tube"])
    frequencies = np.geomspace(1e4, 2e5, 7)
    facts = {"frequency": frequencies, "gauge_pressure": 3e5, "nozzle_diameter": 60e-6}
    all_at_once = solve(WATERY, facts, hole, 7)
    for i, frequency in enumerate(frequencies):
        one = solve(WATERY, {**facts, "frequency": frequency}, hole, 1)
        assert all_at_once.size[i] == pytest.approx(one.size[0], abs=1e-12)
        assert all_at_once.ratio[i] == pytest.approx(one.ratio[0], abs=1e-12)


@given(st.floats(-5.0, 5.0))
def test_optimum_is_that_of_the_full_relation(log_oh):
    # The table's interpolation against the relation itself.
    oh = 10.0**log_oh
    liquid = Liquid(1000.0, oh * math.sqrt(1000.0 * 0.05 * 1e-4), 0.05)
    want = jet.most_unstable_wavelength_viscous_full.si(1000.0, liquid.viscosity, 0.05, 1e-4)
    assert float(most_unstable_ratio(liquid, 1e-4)) * 1e-4 == pytest.approx(want, rel=2e-7)


@pytest.mark.parametrize(
    ("given_words", "used"),
    [
        # Two facts leave the wave free; three that fix it do not.
        ({"drop_volume", "frequency"}, ("drop_volume", "frequency", "most_unstable")),
        ({"frequency", "velocity"}, ("frequency", "velocity", "most_unstable")),
        ({"drop_volume", "jet_diameter"}, ("drop_volume", "jet_diameter")),
        ({"velocity", "frequency", "jet_diameter"}, ("frequency", "velocity", "jet_diameter")),
        # Volume and frequency make the flow: one of the three is too many.
        ({"drop_volume", "frequency", "flow"}, ("drop_volume", "frequency", "most_unstable")),
    ],
)
def test_what_decides(given_words, used):
    assert choose(frozenset(given_words)) == used


def test_roots_are_the_highest_and_counted():
    # x^2 = 1, 4, -1 in (-3.1, 3): two roots, two roots, none.
    squares = np.array([1.0, 4.0, -1.0])
    root, count = highest_root(lambda x: x * x - squares, -3.1, 3.0, (3,))
    assert root[:2] == pytest.approx([1.0, 2.0], abs=1e-12)
    assert np.isnan(root[2])
    assert list(count) == [2, 2, 0]


@given(st.floats(0.5, 1e5), st.sampled_from(sorted(HOLES)))
def test_hole_behind_a_jet_and_back(reynolds, kind):
    hole = Hole(HOLES[kind], length_ratio=HOLES[kind].length_ratio)
    bore = 1e-4
    flow = reynolds * math.pi * 1e-3 * bore / 4.0 / 1000.0
    narrow = float(hole.contraction_of(1000.0, 1e-3, flow, bore))
    again = float(hole.diameter_of(1000.0, 1e-3, flow, narrow * bore))
    assert again == pytest.approx(bore, rel=1e-12)


def test_contraction_has_its_known_ends():
    # models.md 1.10: 0.866 for a parabola [C], 0.990 for the seventh-root profile [C].
    hole = Hole(HOLES["tube"])
    flow = np.array([1500.0, 1e5]) * math.pi * 1e-3 * 1e-4 / 4.0 / 1000.0
    ends = hole.contraction_of(1000.0, 1e-3, flow, 1e-4)
    assert ends == pytest.approx([0.8660254038, 0.9899494937], rel=5e-4)


def test_unknown_hole_is_refused_with_the_choices():
    with pytest.raises(BadInput, match=r"'tube'.*'hole'.*'plate'"):
        hole_kind("funnel")
