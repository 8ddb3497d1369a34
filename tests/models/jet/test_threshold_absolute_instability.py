"""Where a jet turns from absolutely to convectively unstable: values, the saddle itself, limits.

Marks: [C] computed elsewhere; [M+] remembered, and it agrees with [C].
"""

from __future__ import annotations

import math
from typing import Any

import mpmath as mp
import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.models import jet
from dropkit.models.jet import _absolute_threshold as table
from dropkit.models.jet._absolute_threshold import saddle, threshold_speed
from dropkit.models.jet._complex_relation import growth_at, relation

weber_radius = jet.absolute_instability_weber_viscous_radius


def radius_form(oh: Any) -> Any:
    """Critical Weber number on the radius, from rho = gamma = a = 1."""
    return weber_radius(1.0, oh, 1.0, 1.0)


@pytest.mark.parametrize(("oh", "weber"), [(0.01, 2.6256), (0.1, 1.4876), (0.3, 0.7327)])
def test_viscous_values(oh: float, weber: float) -> None:  # [C], on the radius
    assert radius_form(oh) == pytest.approx(weber, abs=6e-5)


def test_inviscid_value() -> None:
    speed = jet.absolute_instability_velocity_inviscid(1.0, 1.0, 2.0)
    assert speed**2 == pytest.approx(3.12255, abs=6e-6)  # [C]; about 3.1 in the literature [M+]
    assert radius_form(1e-15) == pytest.approx(speed**2, rel=1e-9)


def test_inviscid_saddle_in_thirty_digits() -> None:
    with mp.workdps(30):

        def pull(x: Any) -> Any:
            return mp.sqrt((x * x - 1) * x * mp.besseli(1, x) / mp.besseli(0, x))

        # For x > 1 waves are neutral, w = i pull; their least slope is the critical speed.
        x = mp.findroot(lambda z: mp.diff(pull, z, 2), 1.3)
        speed = float(mp.diff(pull, x))
        assert float(x) == pytest.approx(1.2811, abs=6e-5)  # [C]
    found = jet.absolute_instability_velocity_inviscid(1.0, 1.0, 2.0)
    assert found == pytest.approx(speed, rel=1e-14)


def printed(oh: Any, x: Any, w: Any) -> Any:
    """The relation as first printed, over w, because w = 0 solves it at any x."""
    y = mp.sqrt(x * x + w / oh)
    i0, i1, j0, j1 = mp.besseli(0, x), mp.besseli(1, x), mp.besseli(0, y), mp.besseli(1, y)
    bracket = (i0 - i1 / x) - (2 * x * y / (x * x + y * y)) * (i1 / j1) * (j0 - j1 / y)
    pull = x * (1 - x * x) * (i1 / i0) * (y * y - x * x) / (y * y + x * x)
    return (w * w + 2 * oh * x * x / i0 * bracket * w - pull) / w


@pytest.mark.parametrize(
    ("oh", "x", "w"),
    [
        # Where the saddle is, found by following it from a jet at rest [C].
        (0.01, 1.209 - 0.229j, 0.371 + 0.547j),
        (0.1, 0.962 - 0.417j, 0.508 + 0.259j),
        (0.3, 0.667 - 0.495j, 0.424 + 0.066j),
        (1.0, 0.144 - 0.320j, 0.169 - 0.075j),
        (10.0, 0.0108 - 0.0307j, 0.0146 - 0.0091j),
    ],
)
def test_the_viscous_saddle_in_thirty_digits(oh: float, x: complex, w: complex) -> None:
    """dOmega/dk = 0 and Im Omega = 0 for Omega = x v + i w(x), with the printed relation."""
    with mp.workdps(30):
        h = mp.mpf(oh)

        def conditions(a: Any, b: Any, c: Any, d: Any, v: Any) -> list[Any]:
            z, growth = mp.mpc(a, b), mp.mpc(c, d)
            here = printed(h, z, growth) / abs(growth)
            by_x = mp.diff(lambda one: printed(h, one, growth), z)
            by_w = mp.diff(lambda one: printed(h, z, one), growth)
            slope = -by_x / by_w - 1j * v
            return [here.real, here.imag, slope.real, slope.imag, (v * b + c) / abs(growth)]

        start = [x.real, x.imag, w.real, w.imag, threshold_speed(oh) * 1.001]
        speed = float(mp.findroot(conditions, [mp.mpf(one) for one in start], tol=1e-24)[4])
    assert threshold_speed(oh) == pytest.approx(speed, rel=2e-11)


@pytest.mark.parametrize("oh", [0.03, 0.1, 1.0])
def test_followed_from_a_jet_at_rest_growth_in_place_ends_there(oh: float) -> None:
    """The saddle dw/dx = i v from the fastest wave at v = 0: Im Omega falls to 0 at the threshold."""
    h, limit = np.array([oh]), threshold_speed(oh)
    x = np.array(
        [2.0 * math.pi / jet.most_unstable_wavelength_viscous_full(1.0, oh, 1.0, 2.0) + 0j]
    )
    w = np.array([jet.maximum_growth_viscous_full(1.0, oh, 1.0, 2.0) + 0j])

    def slope(x: Any, w: Any) -> tuple[Any, Any]:
        w = growth_at(x, w, h)
        _, by_t, by_w = relation(x * x, w, h)
        return w, -2.0 * x * by_t / by_w

    in_place = []
    for v in np.linspace(0.0, 1.1 * limit, 56):
        for _ in range(5):
            w, inclined = slope(x, w)
            step = 1e-4 * x
            bend = (slope(x + step, w)[1] - slope(x - step, w)[1]) / (2.0 * step)
            x = x - (inclined - 1j * v) / bend
        w, _ = slope(x, w)
        in_place.append(float((v * x.imag + w.real)[0]))
    assert (np.diff(in_place) < 0.0).all()
    assert in_place[49] > 0.0 > in_place[51]
    assert in_place[50] == pytest.approx(0.0, abs=1e-8)


def test_thick_limit() -> None:
    # Long waves: W^2 + 3 X^2 W = X^2/2 with X = Oh x, W = Oh w, whose own saddle is this [C].
    with mp.workdps(25):

        def conditions(a: Any, b: Any, c: Any, d: Any, v: Any) -> list[Any]:
            x, w = mp.mpc(a, b), mp.mpc(c, d)
            relation = w * w + 3 * x * x * w - x * x / 2
            slope = -(6 * x * w - x) / (2 * w + 3 * x * x) - 1j * v
            return [relation.real, relation.imag, slope.real, slope.imag, v * b + c]

        start = [mp.mpf(text) for text in ("0.108", "-0.307", "0.146", "-0.091", "0.476")]
        weber = float(mp.findroot(conditions, start)[4] ** 2)
    assert radius_form(1e6) == pytest.approx(weber, rel=1e-9)
    assert radius_form(1e14) == pytest.approx(weber, rel=1e-9)


@given(st.floats(-7, 6))
def test_between_the_nodes_as_at_the_saddle(power: float) -> None:
    oh = 10.0**power
    z = np.cbrt(oh) / (1.0 + np.cbrt(oh))
    # A start from a coarse table of the saddle, as its module has it for its nodes.
    coarse = np.linspace(0.0, 1.0, len(table._X))
    x = np.interp([z], coarse, np.array(table._X)) / (1.0 + 3.0 * oh)
    w = np.interp([z], coarse, np.array(table._W)) / (1.0 + 3.0 * oh)
    speed, _, _ = saddle(np.array([oh]), x, w)
    assert threshold_speed(oh) == pytest.approx(speed[0], rel=1e-9)


@given(st.floats(-9, 9), st.floats(1.01, 10))
def test_viscosity_lowers_the_threshold(power: float, factor: float) -> None:
    thin, thick = radius_form(10.0**power), radius_form(factor * 10.0**power)
    assert thick <= thin * (1 + 1e-11)
    assert 0.2268 < thick <= 3.12255029


@given(st.floats(-4, 1), st.floats(2.5, 4.3), st.floats(-3, 0), st.floats(-6, -2))
def test_forms_agree_and_scale(mu: float, rho: float, sigma: float, diameter: float) -> None:
    viscosity, density, tension, d = (10.0**power for power in (mu, rho, sigma, diameter))
    liquid = (density, viscosity, tension)
    on_radius = weber_radius(*liquid, 0.5 * d)
    assert on_radius == pytest.approx(
        radius_form(viscosity / math.sqrt(density * tension * 0.5 * d)), rel=1e-12
    )
    assert jet.absolute_instability_weber_viscous(*liquid, d) == pytest.approx(2.0 * on_radius)
    speed = jet.absolute_instability_velocity_viscous(*liquid, d)
    assert density * speed**2 * 0.5 * d / tension == pytest.approx(on_radius, rel=1e-12)
    assert speed <= jet.absolute_instability_velocity_inviscid(density, tension, d) * (1 + 1e-11)


def test_long_wave_equation_gives_four() -> None:
    # 1-D inviscid: w^2 = x^2 (1 - x^2)/2, least slope of sqrt(x^2 (x^2 - 1)/2) at x = sqrt(1.5), 2.
    x = mp.sqrt(mp.mpf(3) / 2)
    slope = mp.diff(lambda z: mp.sqrt(z * z * (z * z - 1) / 2), x)
    assert float(slope) ** 2 == pytest.approx(4.0)
    assert radius_form(1e-15) < float(slope) ** 2
