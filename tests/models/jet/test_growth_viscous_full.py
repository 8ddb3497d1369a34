"""The full viscous relation: closed values, both printed forms in 60 digits, limits and scaling.

Marks: [C] computed from the closed formula elsewhere to 20 digits and more, which tests the code and
not the physics.
"""

from __future__ import annotations

import math
from typing import Any

import mpmath as mp
import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import DropkitWarning, OutOfRange, RangeWarning, Unphysical
from dropkit.models import jet

reduced = jet.reduced_growth_viscous_full
# rho = gamma = a = 1: the viscosity is then the Ohnesorge number on the radius.


def liquid(ohnesorge: Any) -> tuple[Any, ...]:
    return 1.0, ohnesorge, 1.0, 2.0


def first_derivative(z: Any) -> Any:
    return (mp.besseli(0, z) + mp.besseli(2, z)) / 2


def as_first_printed(w: Any, x: Any, oh: Any) -> Any:
    """w^2 + (2 nu k^2/I0) [...] w - (1 - x^2) ..., in units of a, rho and gamma."""
    y = mp.sqrt(x * x + w / oh)
    i0, i1 = mp.besseli(0, x), mp.besseli(1, x)
    bracket = first_derivative(x) - (2 * x * y / (x * x + y * y)) * (
        i1 / mp.besseli(1, y)
    ) * first_derivative(y)
    pull = x * (1 - x * x) * (i1 / i0) * (y * y - x * x) / (y * y + x * x)
    return w * w + 2 * oh * x * x / i0 * bracket * w - pull


def as_second_printed(w: Any, x: Any, oh: Any) -> Any:
    """Chandrasekhar's form: 2 x^2 (x^2 + y^2) ... - (x^4 - y^4) - Oh^-2 x (I1/I0) (1 - x^2)."""
    y = mp.sqrt(x * x + w / oh)
    i0, i1 = mp.besseli(0, x), mp.besseli(1, x)
    inner = (
        (2 * x * y / (x * x + y * y))
        * (i1 * first_derivative(y))
        / (mp.besseli(1, y) * first_derivative(x))
    )
    left = 2 * x * x * (x * x + y * y) * (first_derivative(x) / i0) * (1 - inner)
    return left - (x**4 - y**4) - x * (i1 / i0) * (1 - x * x) / oh**2


def root_of(relation: Any, x: float, oh: float, start: float) -> float:
    """The root near a start, in 60 digits; the start is moved off, so that the search is real."""
    with mp.workdps(60):
        precise = mp.mpf(x), mp.mpf(oh)
        near = mp.mpf(start)
        found = mp.findroot(
            lambda w: relation(w, *precise) / near**2,
            (near * mp.mpf("1.01"), near * mp.mpf("0.99")),
        )
        return float(found)


@pytest.mark.parametrize(
    ("oh", "x", "growth"),
    [  # [C]
        (0.01, 0.5, 0.297874981825),
        (0.1, 0.3, 0.188314838527),
        (0.1, 0.7, 0.280418798793),
        (1.0, 0.5, 0.108694830587),
        (10.0, 0.7, 0.00848147413254),
    ],
)
def test_closed_values(oh: float, x: float, growth: float) -> None:
    assert reduced(x, oh) == pytest.approx(growth, rel=4e-12)
    found = jet.growth_rate_viscous_full(*liquid(oh), 2.0 * math.pi / x)
    assert found == pytest.approx(growth, rel=4e-12)


@pytest.mark.parametrize(
    ("oh", "x", "growth"),
    [  # [C]; the wavenumbers are printed to 5 to 8 digits
        (0.01, 0.68961045, 0.336346301575),
        (0.1, 0.63496844, 0.285463696728),
        (1.0, 0.39938, 0.112889401966),
        (10.0, 0.15001399, 0.0159152981366),
    ],
)
def test_closed_maxima(oh: float, x: float, growth: float) -> None:
    assert jet.maximum_growth_viscous_full(*liquid(oh)) == pytest.approx(growth, rel=4e-12)
    wave = jet.most_unstable_wavelength_viscous_full(*liquid(oh))
    assert 2.0 * math.pi / wave == pytest.approx(x, abs=6e-9 if oh != 1.0 else 6e-6)


@pytest.mark.parametrize(("x", "pace"), [(0.3, 0.151658231006), (0.7, 0.0848667569079)])  # [C]
@pytest.mark.parametrize("oh", [1e5, 1e8, 1e13])
def test_stokes_limit(x: float, pace: float, oh: float) -> None:
    assert reduced(x, oh) * oh == pytest.approx(pace, rel=5e-12 + 1.0 / oh**2)


@given(st.floats(0.001, 0.9999))
def test_inviscid_limit(x: float) -> None:
    inviscid = jet.growth_rate_inviscid(1.0, 1.0, 2.0, 2.0 * math.pi / x)
    # Damping takes off what is of the order of Oh x^2.
    assert reduced(x, 1e-14) == pytest.approx(inviscid, rel=1e-11)


def test_inviscid_limit_of_the_maximum() -> None:
    thin = liquid(1e-14)
    inviscid = jet.maximum_growth_inviscid(1.0, 1.0, 2.0)
    assert jet.maximum_growth_viscous_full(*thin) == pytest.approx(inviscid, rel=1e-13)
    wave = jet.most_unstable_wavelength_viscous_full(*thin)
    assert wave == pytest.approx(jet.most_unstable_wavelength_inviscid(2.0), rel=1e-13)


@given(st.floats(4.0, 13.0))
def test_thick_limit_of_the_maximum(power: float) -> None:
    thick = liquid(10.0**power)
    # gamma/(6 mu a) less what is of the order of 1/Oh; Weber's equation has the same terms.
    assert jet.maximum_growth_viscous_full(*thick) == pytest.approx(
        jet.maximum_growth_viscous_longwave(*thick), rel=10.0 ** (-2 * power) + 1e-15
    )
    wave = jet.most_unstable_wavelength_viscous_full(*thick)
    longwave = jet.most_unstable_wavelength_viscous_longwave(*thick)
    assert wave == pytest.approx(longwave, rel=0.1 * 10.0**-power + 1e-14)


POINTS = np.random.default_rng(20).uniform([0.001, -5.0], [0.9999, 4.0], (40, 2))


EXTREME = [[x, power] for x in (0.02, 0.6, 0.99) for power in (-12.0, -8.0, 8.0, 12.0)]


@pytest.mark.parametrize("relation", [as_first_printed, as_second_printed])
@pytest.mark.parametrize(("x", "power"), [*POINTS.tolist(), *EXTREME])
def test_both_printed_forms_in_sixty_digits(relation: Any, x: float, power: float) -> None:
    oh = 10.0**power
    found = reduced(x, oh)
    assert found == pytest.approx(root_of(relation, x, oh, found), rel=2e-15)


@pytest.mark.parametrize("power", np.linspace(-5.0, 4.0, 10).tolist())
def test_the_maximum_in_sixty_digits(power: float) -> None:
    oh = 10.0**power
    x = 2.0 * math.pi / jet.most_unstable_wavelength_viscous_full(*liquid(oh))
    most = jet.maximum_growth_viscous_full(*liquid(oh))
    assert most == pytest.approx(root_of(as_first_printed, x, oh, most), rel=2e-15)
    with mp.workdps(60):
        w, h = mp.findroot(lambda w: as_first_printed(w, mp.mpf(x), mp.mpf(oh)), most), mp.mpf(oh)
        by_x = mp.diff(lambda z: as_first_printed(w, z, h), mp.mpf(x))
        twice = mp.diff(lambda z: as_first_printed(w, z, h), mp.mpf(x), 2)
        # How far the true maximum lies from ours.
        assert abs(by_x / twice) < 1e-14 * x


@given(st.floats(-6, 6), st.floats(1e-4, 0.9999))
def test_never_above_the_maximum_nor_above_the_long_wave_form(power: float, x: float) -> None:
    oh = 10.0**power
    growth = reduced(x, oh)
    assert 0.0 < growth <= jet.maximum_growth_viscous_full(*liquid(oh)) * (1 + 1e-14)
    wave = 2.0 * math.pi / x
    assert growth < jet.growth_rate_viscous_longwave(*liquid(oh), wave) * (1 + 1e-12)
    assert growth < jet.growth_rate_inviscid(1.0, 1.0, 2.0, wave) * (1 + 1e-12)


@given(st.floats(1e-4, 0.9999), st.floats(-6, 4), st.floats(1.001, 100))
def test_more_viscosity_never_speeds_growth(x: float, power: float, factor: float) -> None:
    assert reduced(x, factor * 10.0**power) < reduced(x, 10.0**power)


@given(st.floats(-6, 6), st.floats(1e-6, 1e-3))
def test_long_waves_grow_as_weber_says(power: float, x: float) -> None:
    oh = 10.0**power
    longwave = jet.growth_rate_viscous_longwave(*liquid(oh), 2.0 * math.pi / x)
    assert reduced(x, oh) == pytest.approx(longwave, rel=1e-6)


@given(
    st.floats(0.01, 0.99),
    st.floats(-4, 0.5),
    st.floats(2.5, 4),
    st.floats(-3, 0),
    st.floats(-6, -2),
)
def test_scaling(x: float, mu: float, rho: float, sigma: float, d: float) -> None:
    viscosity, density, tension, diameter = (10.0**p for p in (mu, rho, sigma, d))
    radius = 0.5 * diameter
    oh = viscosity / math.sqrt(density * tension * radius)
    scale = math.sqrt(tension / (density * radius**3))
    wave = math.pi * diameter / x
    found = jet.growth_rate_viscous_full(density, viscosity, tension, diameter, wave)
    assert found == pytest.approx(scale * reduced(x, oh), rel=1e-11)
    most = jet.maximum_growth_viscous_full(density, viscosity, tension, diameter)
    assert most == pytest.approx(scale * jet.maximum_growth_viscous_full(*liquid(oh)), rel=1e-12)


def test_arrays_give_what_floats_give() -> None:
    """More elements than one block holds, on both sides of where the series ends."""
    rng = np.random.default_rng(8)
    x, oh = rng.uniform(0.0, 1.0, (3, 3001)), 10.0 ** rng.uniform(-6, 6, (3, 1))
    found = reduced(x, oh)
    assert found.shape == (3, 3001)
    some = [(i, j) for i in range(3) for j in range(0, 3001, 100)]
    for i, j in some:
        assert found[i, j] == pytest.approx(reduced(float(x[i, j]), float(oh[i, 0])), rel=1e-15)
    smooth = reduced(0.6, np.geomspace(0.05, 0.5, 5001))  # s = w/Oh passes 1 on the way
    bend = np.diff(np.log(smooth), 3)
    assert np.abs(bend).max() < 1e-9


def test_growth_is_zero_at_the_cut_off() -> None:
    oh = 10.0 ** np.linspace(-12, 12, 25)
    assert (reduced(1.0, oh) == 0.0).all()
    cut = jet.cut_off_wavelength(2.0)
    assert (jet.growth_rate_viscous_full(1.0, oh, 1.0, 2.0, cut) == 0.0).all()


def test_beyond_the_cut_off_the_policy_rules() -> None:
    x = np.array([0.5, 1.5, np.nan])
    with pytest.raises(OutOfRange, match=r"1 of 3 .*\[1\] = 1\.5"):
        reduced(x, 0.1)
    silent = reduced(x, 0.1, outside="nan")
    assert np.isnan(silent).tolist() == [False, True, True]
    allowed = reduced(x, 0.1, outside="allow")
    assert allowed[0] == silent[0]
    with pytest.warns(RangeWarning, match="reduced wavenumber"):
        assert reduced(1.5, 0.1, outside="warn") == allowed[1]
    with pytest.raises(Unphysical):
        reduced(0.5, 0.0)


@pytest.mark.parametrize(
    ("x", "oh"), [(1.001, 1.0), (1.5, 0.01), (1.2, 0.3), (3.0, 0.1), (4.9, 20.0), (2.0, 1e-4)]
)
def test_decay_beyond_the_cut_off_solves_the_printed_form(x: float, oh: float) -> None:
    found = reduced(x, oh, outside="allow")
    assert found < 0.0
    # Weber's root is near enough to tell a pair of complex roots from real ones.
    damping = 1.5 * oh * x * x
    inner = mp.mpc(damping**2 + 0.5 * x * x * (1 - x * x))
    start = x * x * (1 - x * x) / (2 * (damping + mp.sqrt(inner)))
    with mp.workdps(30):
        # Over w, because w = 0 solves the printed form at any wavelength.
        precise = mp.mpf(x), mp.mpf(oh)
        w = mp.findroot(lambda w: as_first_printed(w, *precise) / w, start * (1 + 0.05j))
    assert found == pytest.approx(float(w.real), rel=1e-9)


def test_far_beyond_the_cut_off_nothing_is_said() -> None:
    with pytest.warns(DropkitWarning, match="no finite value"):
        assert math.isnan(reduced(7.0, 0.1, outside="allow"))
