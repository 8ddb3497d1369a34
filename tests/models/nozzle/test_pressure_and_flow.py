"""The five laws of pressure and flow: closed limits, outside values, and what holds for all alike.

Marks: [C] closed formula; [S2] someone else's copy of the source; [M] from memory.
"""

from __future__ import annotations

import csv
import math
from typing import Any, NamedTuple

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy.optimize import brentq

from dropkit.boundary import Boundary
from dropkit.errors import BadInput, DropkitWarning, OutOfRange, UnitError, Unphysical
from dropkit.models import nozzle
from dropkit.records import data_dir


class Law(NamedTuple):
    """A pair of functions with ranges in which both hold."""

    pressure: Boundary[..., Any]
    flow: Boundary[..., Any]
    reynolds: tuple[float, float]
    ratio: tuple[float, float]


LAWS = {
    "laminar tube": Law(
        nozzle.pressure_laminar_tube, nozzle.flow_laminar_tube, (1e-3, 2000.0), (45.0, 500.0)
    ),
    "developing tube": Law(
        nozzle.pressure_developing_tube, nozzle.flow_developing_tube, (1e-2, 2000.0), (0.3, 300.0)
    ),
    "turbulent tube": Law(
        nozzle.pressure_turbulent_tube, nozzle.flow_turbulent_tube, (4100.0, 9e4), (10.5, 200.0)
    ),
    "long orifice": Law(
        nozzle.pressure_long_orifice, nozzle.flow_long_orifice, (5.0, 1e4), (1.6, 9.9)
    ),
    "thin plate": Law(
        nozzle.pressure_thin_plate, nozzle.flow_thin_plate, (1e-3, 1e5), (0.01, 0.49)
    ),
}
every_law = pytest.mark.parametrize("law", LAWS.values(), ids=LAWS)
WATER = (998.2, 1.0e-3, 0.0727)

shares = st.floats(0.0, 1.0)
liquids = st.tuples(st.floats(600.0, 3000.0), st.floats(2e-4, 2.0), st.floats(1e-6, 0.5))
diameters = st.floats(2e-5, 2e-3)


def between(ends: tuple[float, float], share: float) -> float:
    """A value between two ends, even in the logarithm."""
    return float(ends[0] * (ends[1] / ends[0]) ** share)


def case(law: Law, liquid: Any, d: float, s: float, t: float) -> tuple[float, float]:
    """Flow and length inside the ranges of a law."""
    density, viscosity, _ = liquid
    flow = math.pi / 4.0 * d * between(law.reynolds, s) * viscosity / density
    return flow, d * between(law.ratio, t)


@every_law
@given(liquids, diameters, shares, shares)
def test_flow_undoes_pressure(law: Law, liquid: Any, d: float, s: float, t: float) -> None:
    flow, length = case(law, liquid, d, s, t)
    parts = law.pressure(*liquid, flow, d, length, outside="allow")
    # Where surface tension makes almost all of the pressure, it hides the rest.
    lost = parts.total / (parts.total - parts.capillary)
    again = law.flow(*liquid, parts.total, d, length, outside="allow")
    assert again == pytest.approx(flow, rel=1e-13 * (10.0 + 10.0 * lost))


@every_law
@given(liquids, diameters, shares, shares)
def test_the_parts_make_the_total(law: Law, liquid: Any, d: float, s: float, t: float) -> None:
    flow, length = case(law, liquid, d, s, t)
    for contraction in (0.9, 1.1):
        parts = law.pressure(*liquid, flow, d, length, contraction=contraction, outside="allow")
        assert parts.total == pytest.approx(sum(parts[1:]), rel=1e-14)
        assert parts.capillary == pytest.approx(4.0 * liquid[2] / (2.0 * contraction * d))
        assert min(parts) > 0.0


@every_law
@given(liquids, diameters, shares, shares, st.floats(1.01, 3.0))
def test_at_equal_pressure_viscosity_lowers_the_flow(
    law: Law, liquid: Any, d: float, s: float, t: float, by: float
) -> None:
    flow, length = case(law, liquid, d, s, t)
    pressure = law.pressure(*liquid, flow, d, length, outside="allow").total
    density, viscosity, tension = liquid
    base = law.flow(*liquid, pressure, d, length, outside="allow")
    thick = law.flow(density, by * viscosity, tension, pressure, d, length, outside="allow")
    assert thick < base
    # More pressure, or a wider hole, gives more.
    assert law.flow(*liquid, by * pressure, d, length, outside="allow") > base
    assert law.flow(*liquid, pressure, by * d, length, outside="allow") > base


@every_law
@given(liquids, diameters, shares, shares)
def test_pressure_rises_with_flow(law: Law, liquid: Any, d: float, s: float, t: float) -> None:
    flow, length = case(law, liquid, d, s, t)
    grid = flow * np.geomspace(0.2, 5.0, 60)
    total = law.pressure(*liquid, grid, d, length, outside="allow").total
    assert (np.diff(total) > 0.0).all()


@pytest.mark.parametrize("name", ["developing tube", "turbulent tube", "long orifice"])
def test_the_root_is_the_one_that_a_scalar_solver_finds(name: str) -> None:
    law = LAWS[name]
    for s, t, d in [(0.1, 0.2, 5e-5), (0.5, 0.9, 2e-4), (0.95, 0.6, 1e-3)]:
        flow, length = case(law, WATER, d, s, t)
        pressure = law.pressure(*WATER, flow, d, length).total

        def excess(q: float, d: float = d, length: float = length, p: float = pressure) -> float:
            total = LAWS[name].pressure(*WATER, q, d, length, outside="allow").total
            return float(total - p)

        found = brentq(excess, 0.3 * flow, 3.0 * flow, xtol=1e-25, rtol=1e-14)
        assert law.flow(*WATER, pressure, d, length) == pytest.approx(found, rel=1e-12)


@every_law
def test_a_hundred_thousand_at_once_agree_with_single_ones(law: Law) -> None:
    draw = np.random.default_rng(4)
    d = draw.uniform(3e-5, 1e-3, 100_000)
    reynolds = between(law.reynolds, 0.3) * draw.uniform(1.0, 1.5, d.size)
    length = d * between(law.ratio, 0.5)
    flow = math.pi / 4.0 * d * reynolds * WATER[1] / WATER[0]
    pressure = law.pressure(*WATER, flow, d, length).total
    again = law.flow(*WATER, pressure, d, length)
    np.testing.assert_allclose(again, flow, rtol=1e-11)
    for i in (0, 777, 99_999):
        assert law.flow(*WATER, float(pressure[i]), float(d[i]), float(length[i])) == (
            pytest.approx(again[i], rel=1e-13)
        )


@every_law
def test_any_argument_alone_may_be_an_array(law: Law) -> None:
    flow, length = case(law, WATER, 1e-4, 0.4, 0.5)
    pressure = law.pressure(*WATER, flow, 1e-4, length).total
    for function, middle in ((law.flow, pressure), (law.pressure, flow)):
        call = [*WATER, middle, 1e-4, length]
        for i, value in enumerate(call):
            several = [*call[:i], value * np.array([1.0, 1.001]), *call[i + 1 :]]
            found = np.asarray(function(*several, outside="allow"))
            single = np.asarray(function(*call, outside="allow"))
            np.testing.assert_allclose(found[..., 0], single, rtol=1e-13)
            assert found.shape[-1] == 2


@every_law
def test_no_flow_where_surface_tension_holds_the_liquid_back(law: Law) -> None:
    d, length = 5e-5, 5e-5 * between(law.ratio, 0.5)
    low = 0.99 * law.pressure(*WATER, 1e-9, d, length, outside="allow").capillary
    with pytest.raises(OutOfRange, match="capillary pressure"):
        law.flow(*WATER, low, d, length)
    assert math.isnan(law.flow(*WATER, low, d, length, outside="nan"))
    with pytest.warns(DropkitWarning, match="no finite value"):
        assert math.isnan(law.flow(*WATER, low, d, length, outside="allow"))
    with pytest.raises(Unphysical, match="gauge_pressure"):
        law.flow(*WATER, -1e5, d, length)


@every_law
def test_a_pressure_says_gauge(law: Law) -> None:
    d, length = 5e-5, 5e-5 * between(law.ratio, 0.5)
    with pytest.raises(UnitError, match="gauge"):
        law.flow(*WATER, "3 bara", d, length)
    plain = law.flow(*WATER, 3e5, d, length, outside="allow")
    assert law.flow(*WATER, "3 barg", d, length, outside="allow").to("m^3/s").magnitude == (
        pytest.approx(plain, rel=1e-12)
    )


# --- closed limits and outside values --------------------------------------------------------


@given(st.floats(0.5, 50.0), st.floats(1e4, 1e6))
def test_a_very_viscous_liquid_obeys_poiseuille(viscosity: float, pressure: float) -> None:
    # Q = pi d^4 dp/(128 mu L) [C], with the entry as 3 pi/32 diameters more of length.
    d, length = 1e-4, 2e-3
    whole = length + 3.0 * math.pi / 32.0 * d
    expected = math.pi * d**4 * pressure / (128.0 * viscosity * whole)
    for flow in (nozzle.flow_laminar_tube, nozzle.flow_developing_tube):
        assert flow(1000.0, viscosity, 1e-9, pressure, d, length) == pytest.approx(
            expected, rel=2e-3
        )


def test_a_long_tube_is_the_same_by_both_laminar_laws() -> None:
    # 2.28 as Merritt is quoted against 1 + 1.25 in Shah's form.
    for reynolds in (1.0, 30.0, 300.0):
        d = 1e-4
        flow = math.pi / 4.0 * d * reynolds * WATER[1] / WATER[0]
        one = nozzle.pressure_laminar_tube(*WATER, flow, d, 300.0 * d)
        other = nozzle.pressure_developing_tube(*WATER, flow, d, 300.0 * d)
        assert one.total == pytest.approx(other.total, rel=1e-3)
        assert other.total < one.total


def test_short_tube_against_merritt() -> None:
    # (1.5 + 13.74 sqrt(L/(Re d)))^-0.5, (2.28 + 64 L/(Re d))^-0.5 [S2], against the others here.
    d = 1e-4
    for velocity, ratio in [(10.0, 1.0), (10.0, 2.4), (4.0, 0.9), (20.0, 4.9)]:
        merritt = nozzle.discharge_coefficient_short_tube(*WATER[:2], velocity, d, ratio * d)
        flow = math.pi / 4.0 * d * d * velocity
        parts = nozzle.pressure_developing_tube(*WATER, flow, d, ratio * d, entry_loss=0.5)
        head = 0.5 * WATER[0] * velocity**2
        creeping = 3.0 * math.pi * WATER[1] * velocity / d
        loss = (parts.total - parts.capillary - creeping) / head
        reynolds = WATER[0] * velocity * d / WATER[1]
        assert reynolds / ratio > 400.0
        assert loss == pytest.approx(merritt**-2, rel=0.01)
    at = nozzle.discharge_coefficient_short_tube(1000.0, 1e-3, 0.1, 1e-3, 2e-3)
    assert at == pytest.approx(1.0 / math.sqrt(1.5 + 13.74 * math.sqrt(0.02)), rel=0.02)
    below = nozzle.discharge_coefficient_short_tube(1000.0, 1e-3, 0.01, 1e-3, 2e-3)
    assert below == pytest.approx(1.0 / math.sqrt(2.28 + 64.0 * 0.2), rel=1e-12)
    arrays = nozzle.discharge_coefficient_short_tube(
        1000.0, 1e-3, np.array([0.01, 1.0]), 1e-3, 2e-3
    )
    assert arrays[0] == below


@pytest.mark.parametrize(("ratio", "computed"), [(0.10, 41.8), (0.37, 57.7)])
def test_creeping_flow_through_a_plate_against_computed_values(
    ratio: float, computed: float
) -> None:
    # dp = K mu U/(2 d) with liquid on both sides, K computed by finite elements on a course page of
    # the University of Washington [S]. Here one side only: the entry counts twice.
    d, mu = 1e-3, 1.0
    flow = math.pi / 4.0 * d * d * 1e-6
    parts = nozzle.pressure_thin_plate(1.0, mu, 1e-9, flow, d, ratio * d)
    both = 2.0 * parts.entry + parts.viscous
    assert both / (mu * 1e-6 / (2.0 * d)) == pytest.approx(computed, rel=0.07)


def test_sampson() -> None:
    # Q = d^3 dp/(24 mu) for an infinitely thin plate, liquid on both sides [S2].
    d, mu, flow = 1e-3, 1.0, 1e-13
    parts = nozzle.pressure_thin_plate(1.0, mu, 1e-9, flow, d, 1e-9)
    assert 2.0 * parts.entry == pytest.approx(24.0 * mu * flow / d**3, rel=1e-12)


def test_blasius_against_colebrook() -> None:
    # 1/sqrt(f) = 1.8 log10(Re/6.9), Mechanical Engineers' Handbook vol. 4 p. 79 [S].
    d, ratio = 1e-3, 50.0
    reynolds = np.geomspace(4e3, 1e5, 40)
    velocity = reynolds * WATER[1] / (WATER[0] * d)
    parts = nozzle.pressure_turbulent_tube(
        *WATER, math.pi / 4.0 * d * d * velocity, d, ratio * d, outside="allow"
    )
    factor = parts.viscous / (0.5 * WATER[0] * velocity**2 * ratio)
    np.testing.assert_allclose(factor, (1.8 * np.log10(reynolds / 6.9)) ** -2, rtol=0.034)


def test_the_energy_of_the_turbulent_profile() -> None:
    # Mean of u^3 over the cube of the mean of u, for u = (1 - r)^(1/7), by Gauss-Legendre here.
    y, weight = np.polynomial.legendre.leggauss(40)
    wall = (0.5 * (y + 1.0)) ** 7  # substituted so that the root is a polynomial
    measure = 0.5 * weight * 7.0 * (0.5 * (y + 1.0)) ** 6 * 2.0 * (1.0 - wall)
    u = 0.5 * (y + 1.0)
    factor = (u**3 * measure).sum() / (u * measure).sum() ** 3
    parts = nozzle.pressure_turbulent_tube(*WATER, 1e-5, 1e-3, 0.03)
    head = 0.5 * WATER[0] * (1e-5 * 4.0 / (math.pi * 1e-6)) ** 2
    assert parts.kinetic / head == pytest.approx(factor, rel=1e-12)


def test_water_from_a_sharp_orifice_as_measured() -> None:
    # Encyclopaedia Britannica 1911, "Hydraulics", table of sharp-edged orifices [S].
    path = data_dir() / "published" / "nozzles" / "Britannica1911.csv"
    lines = [x for x in path.read_text(encoding="utf-8").splitlines() if not x.startswith("#")]
    rows = list(csv.DictReader(lines))
    head = np.array([float(row["head_m"]) for row in rows])
    d = np.array([float(row["nozzle_diameter_m"]) for row in rows])
    measured = np.array([float(row["discharge_coefficient"]) for row in rows])
    gravity = float(rows[0]["gravity_m_s2"])
    pressure = nozzle.gravity_head(999.0, head, gravity=gravity)
    flow = nozzle.flow_thin_plate(999.0, 1.2e-3, 0.0735, pressure, d, 1e-6)
    ideal = math.pi / 4.0 * d * d * np.sqrt(2.0 * pressure / 999.0)
    error = flow / ideal / measured - 1.0
    assert len(rows) == 11
    # As docs/nozzles.md states it.
    assert error.mean() == pytest.approx(0.006, abs=0.001)
    assert error.min() == pytest.approx(-0.017, abs=0.001)
    assert error.max() == pytest.approx(0.013, abs=0.001)


# --- Lichtarowicz ----------------------------------------------------------------------------


@pytest.mark.parametrize(
    ("head", "expected"),
    # A reader's table of equation 12 at L/d = 2, checked there against figure 10 [S2].
    [(10.0, 0.0817), (100.0, 0.4284), (1000.0, 0.7446), (1e4, 0.8081), (2e4, 0.8088165976866)],
)
def test_long_orifice_against_copies(head: float, expected: float) -> None:
    pressure = head**2 * 1e-6 / (2.0 * 1000.0 * 1e-6)
    got = nozzle.discharge_coefficient_long_orifice(1000.0, 1e-3, pressure, 1e-3, 2e-3)
    assert got == pytest.approx(expected, abs=6e-5)


def test_long_orifice_ends() -> None:
    # Equation 7 within 0.003 at the end of the range; the figure crosses 0.5 near 160 [S2].
    for ratio in (2.0, 5.0, 10.0):
        got = nozzle.discharge_coefficient_long_orifice(1000.0, 1e-3, 2e5, 1e-3, ratio * 1e-3)
        assert got == pytest.approx(0.827 - 0.0085 * ratio, abs=0.003)
    pressure = np.array([100.0, 160.0, 300.0]) ** 2 * 1e-6 / (2.0 * 1000.0 * 1e-6)
    low, near, high = nozzle.discharge_coefficient_long_orifice(1000.0, 1e-3, pressure, 1e-3, 2e-3)
    assert low < 0.5 < high
    assert near == pytest.approx(0.5, abs=0.03)
    # Measured for short mouthpieces: 0.82 (Encyclopaedia Britannica 1911) [S].
    got = nozzle.discharge_coefficient_long_orifice(1000.0, 1e-3, 2e5, 1e-3, 2.5e-3)
    assert got == pytest.approx(0.82, rel=0.02)


def test_the_reynolds_number_of_lichtarowicz_is_that_of_the_head() -> None:
    # At low Reynolds number his form must come near Poiseuille's law. With the number on the head
    # it does; on the mean speed it would need 35 times the pressure.
    d, ratio = 1e-3, 10.0
    mu, rho = 0.05, 1000.0
    pressure = (30.0 * mu / d) ** 2 / (2.0 * rho)
    flow = nozzle.flow_long_orifice(rho, mu, 1e-9, pressure, d, ratio * d)
    poiseuille = nozzle.flow_laminar_tube(rho, mu, 1e-9, pressure, d, ratio * d)
    assert flow == pytest.approx(poiseuille, rel=0.45)
    mean = 10.0
    wrong = (1.0 / (0.827 - 0.085) + 20.0 * (1.0 + 2.25 * ratio) / mean) ** 2
    assert wrong / (2.28 + 64.0 * ratio / mean) == pytest.approx(35.3, rel=0.01)


def test_holes_that_are_too_short_or_too_long_are_refused() -> None:
    for ratio in (1.0, 11.0):
        with pytest.raises(OutOfRange, match="length over the diameter"):
            nozzle.flow_long_orifice(*WATER, 2e5, 1e-4, ratio * 1e-4)
    # Ten diameters are in, however they are written.
    assert nozzle.flow_long_orifice(*WATER, 2e5, 1e-4, 1e-3) > 0.0
    assert nozzle.pressure_turbulent_tube(*WATER, 1e-5, 1e-3, 10 * 1e-3).total > 0.0
    with pytest.raises(OutOfRange, match="length over the diameter"):
        nozzle.flow_thin_plate(*WATER, 2e5, 1e-4, 1e-4)
    with pytest.raises(OutOfRange, match="diameter over length"):
        nozzle.flow_laminar_tube(*WATER, 2e5, 1e-4, 2e-4)
    with pytest.raises(OutOfRange, match="Reynolds number"):
        nozzle.pressure_laminar_tube(*WATER, 1e-5, 1e-3, 1.0)
    with pytest.raises(OutOfRange, match="Reynolds number"):
        nozzle.pressure_turbulent_tube(*WATER, 1e-6, 1e-3, 1.0)


# --- a known coefficient, a loss-free jet ----------------------------------------------------


@given(liquids, diameters, st.floats(0.1, 1.0), st.floats(1.01, 1e5))
def test_coefficient_flow_and_pressure(
    liquid: Any, d: float, coefficient: float, over: float
) -> None:
    density, _, tension = liquid
    pressure = over * 4.0 * tension / d
    flow = nozzle.flow_from_coefficient(density, tension, pressure, d, coefficient)
    back = nozzle.pressure_from_coefficient(density, tension, flow, d, coefficient)
    assert back.total == pytest.approx(pressure, rel=1e-12)
    found = nozzle.discharge_coefficient_from_flow(density, tension, flow, pressure, d)
    assert found == pytest.approx(coefficient, rel=1e-12)
    # Without losses and contraction it is the loss-free jet.
    whole = nozzle.flow_from_coefficient(density, tension, pressure, d, 1.0)
    speed = nozzle.jet_velocity_inviscid(density, tension, pressure, d)
    assert whole == pytest.approx(math.pi / 4.0 * d * d * speed, rel=1e-12)


def test_a_jet_faster_than_a_loss_free_one_is_refused() -> None:
    with pytest.raises(OutOfRange, match="velocity coefficient"):
        nozzle.flow_from_coefficient(998.2, 0.0727, 2e5, 1e-4, 0.7, contraction=0.8)
    # The weighed flow does not fit: the pressure was not what was stated.
    with pytest.raises(OutOfRange, match="velocity coefficient"):
        nozzle.discharge_coefficient_from_flow(998.2, 0.0727, 2e-7, 1e5, 1e-4)


def test_the_loss_free_jet() -> None:
    # models.md 1.10 [C]: water (998, 0.0728), radius 25 um, 100 kPa; without surface tension.
    assert nozzle.jet_velocity_inviscid(998.0, 0.0728, 1e5, 50e-6) == pytest.approx(
        13.94866052, rel=1e-9
    )
    assert nozzle.jet_velocity_inviscid(998.0, 1e-12, 1e5, 50e-6) == pytest.approx(
        14.15629901, rel=1e-9
    )
    assert nozzle.pressure_inviscid_jet(998.0, 0.0728, 13.94866052, 50e-6) == pytest.approx(
        1e5, rel=1e-9
    )
    with pytest.raises(OutOfRange, match="capillary pressure"):
        nozzle.jet_velocity_inviscid(998.0, 0.0728, 2.9e3, 50e-6)


# --- heads, gauge and absolute ---------------------------------------------------------------


def test_heads_and_kinds_of_pressure() -> None:
    assert nozzle.gravity_head(1000.0, 1.0) == pytest.approx(9806.65, rel=1e-15)
    assert nozzle.gauge_from_absolute(201325.0) == pytest.approx(1e5, rel=1e-12)
    assert nozzle.gauge_from_absolute("3 bara", ambient_pressure="1 bara").to("bar").magnitude == (
        pytest.approx(2.0, rel=1e-12)
    )
    assert nozzle.absolute_from_gauge(nozzle.gauge_from_absolute(5e5)) == pytest.approx(5e5)
    assert nozzle.gauge_from_absolute(5e4) < 0.0
    with pytest.raises(UnitError, match="absolute"):
        nozzle.gauge_from_absolute("3 barg")
    with pytest.raises(UnitError, match="gauge"):
        nozzle.absolute_from_gauge("3 bara")


# --- many holes ------------------------------------------------------------------------------


def test_many_holes() -> None:
    given_ = (*WATER, 2e5, 60e-6, 2e-3)
    found = nozzle.parallel_flow(*given_, holes=250.0, diameter_tolerance=1e-6)
    assert found.each == nozzle.flow_laminar_tube(*given_)
    assert found.total == pytest.approx(250.0 * found.each, rel=1e-14)
    assert found.narrow == nozzle.flow_laminar_tube(*WATER, 2e5, 60e-6 - 1e-6, 2e-3)
    assert found.wide == nozzle.flow_laminar_tube(*WATER, 2e5, 60e-6 + 1e-6, 2e-3)
    # Measured holes go in as an array; their sum is the flow in all.
    holes = np.array([59e-6, 60e-6, 61e-6])
    single = nozzle.flow_laminar_tube(*WATER, 2e5, holes, 2e-3)
    assert single.sum() == pytest.approx(found.narrow + found.each + found.wide, rel=1e-13)


@given(st.floats(1e-4, 1e-2))
def test_tolerance_acts_by_the_fourth_power_or_the_square(share: float) -> None:
    d = 1e-4
    thick = (1000.0, 50.0, 1e-9, 1e5, d, 1e-2)
    found = nozzle.parallel_flow(*thick, diameter_tolerance=share * d)
    assert found.wide / found.each == pytest.approx((1.0 + share) ** 4, rel=1e-3)
    thin = (1000.0, 1e-7, 1e-9, 1e5, d, 2e-5)
    found = nozzle.parallel_flow(*thin, diameter_tolerance=share * d, kind="thin plate")
    assert found.narrow / found.each == pytest.approx((1.0 - share) ** 2, rel=1e-4)


@pytest.mark.parametrize("kind", LAWS)
def test_each_kind_of_hole(kind: Any) -> None:
    law = LAWS[kind]
    flow, length = case(law, WATER, 1e-4, 0.5, 0.5)
    pressure = law.pressure(*WATER, flow, 1e-4, length).total
    found = nozzle.parallel_flow(*WATER, pressure, 1e-4, length, kind=kind, holes=3.0)
    assert found.total == pytest.approx(3.0 * flow, rel=1e-12)


def test_what_many_holes_refuse() -> None:
    given_ = (*WATER, 2e5, 60e-6, 2e-3)
    for kind in ("laminar tubes", None, 3):
        with pytest.raises(BadInput, match="kind"):
            nozzle.parallel_flow(*given_, kind=kind)  # type: ignore[call-overload]
    for tolerance in (60e-6, np.array([1e-6, 1e-4])):
        with pytest.raises(BadInput, match="no hole"):
            nozzle.parallel_flow(*given_, diameter_tolerance=tolerance)
