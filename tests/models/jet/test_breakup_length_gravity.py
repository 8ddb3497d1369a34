"""Falling jets: thinning, growth added up along the way, and the stretched viscous limit.

Marks: [C] computed elsewhere from the closed formula or by another way; [S] published statement.
"""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy.integrate import quad
from scipy.optimize import brentq, minimize_scalar

from dropkit.errors import OutOfRange, Unphysical
from dropkit.models import jet


# --- free fall -------------------------------------------------------------------------------
def test_free_fall_closed_value() -> None:
    # U0 = 1, z = 0.1 m, g = 9.80665: d/d0 = 0.7623041752 [C]
    assert jet.jet_diameter_free_fall(1.0, 1e-3, 0.1) == pytest.approx(0.7623041752e-3, rel=1e-9)
    assert jet.jet_velocity_free_fall(1.0, 0.1, gravity=0.0) == 1.0


@given(st.floats(0.05, 30.0), st.floats(1e-4, 10.0), st.floats(0.0, 30.0))
def test_the_flow_stays_the_same(velocity: float, distance: float, gravity: float) -> None:
    faster = jet.jet_velocity_free_fall(velocity, distance, gravity=gravity)
    thinner = jet.jet_diameter_free_fall(velocity, 1e-3, distance, gravity=gravity)
    assert jet.jet_flow(faster, thinner) == pytest.approx(jet.jet_flow(velocity, 1e-3), rel=1e-12)


# --- growth along the way --------------------------------------------------------------------
def by_quadrature(ohnesorge: float, pull: float, constant: float) -> tuple[float, float]:
    """Time and wavenumber by scipy: quadrature, search over waves, root over times."""

    def rate(s: float, wave: float) -> float:
        h, x = ohnesorge * math.exp(0.25 * s), math.exp(wave - 1.5 * s)
        if x >= 1.0:
            return 0.0
        damping = 1.5 * h * x * x
        drive = 0.5 * x * x * (1.0 - x * x)
        growth = drive / (damping + math.sqrt(damping**2 + drive))
        return growth * math.exp(1.75 * s) / pull

    def gain(time: float, wave: float) -> float:
        end = math.log1p(pull * time)
        begin = min(max(wave / 1.5, 0.0), end)
        return float(quad(rate, begin, end, args=(wave,), epsabs=1e-12, epsrel=1e-11, limit=300)[0])

    def best(time: float) -> tuple[float, float]:
        grid = np.linspace(-3.0, 6.0, 46)
        first = int(np.argmax([gain(time, wave) for wave in grid]))
        inside = (grid[max(first - 1, 0)], grid[min(first + 1, 45)])
        found = minimize_scalar(
            lambda wave: -gain(time, wave), bounds=inside, method="bounded", options={"xatol": 1e-9}
        )
        return -float(found.fun), math.exp(found.x)

    time = float(brentq(lambda t: best(t)[0] - constant, 1.0, 1e3, xtol=1e-9, rtol=1e-12))
    return time, best(time)[1]


@pytest.mark.parametrize(
    ("ohnesorge", "pull", "constant"),
    [(0.01, 0.01, 10.0), (0.005, 0.035, 10.0), (0.3, 0.1, 10.0), (5.0, 1.0, 14.0)],
)
def test_against_quadrature_and_search(ohnesorge: float, pull: float, constant: float) -> None:
    time, wave = by_quadrature(ohnesorge, pull, constant)
    found = jet.gravity_thinned_breakup_length(
        1.0, ohnesorge, 1.0, 5.0, 2.0, constant=constant, gravity=5.0 * pull
    )
    assert found.length == pytest.approx(5.0 * time * (1.0 + 0.5 * pull * time), rel=1e-8)
    assert found.wavelength == pytest.approx(2.0 * math.pi / wave, rel=1e-5)
    assert found.jet_diameter == pytest.approx(2.0 * (1.0 + pull * time) ** -0.5, rel=1e-8)


@given(st.floats(-3.0, -0.5), st.floats(3.0, 60.0), st.floats(5.0, 20.0))
def test_without_gravity_it_is_the_natural_length(
    power: float, speed: float, constant: float
) -> None:
    case = (1.0, 10.0**power, 1.0, speed, 1.0)
    for gravity in (0.0, 1e-13):
        found = jet.gravity_thinned_breakup_length(*case, constant=constant, gravity=gravity)
        plain = jet.natural_breakup_length(*case, constant=constant)
        assert found.length == pytest.approx(plain.length, rel=1e-8)
        wave = jet.most_unstable_wavelength_viscous_longwave(*case[:3], 1.0)
        assert found.wavelength == pytest.approx(wave, rel=1e-5)
        assert found.jet_diameter == pytest.approx(1.0, rel=1e-8)


@given(st.floats(-3.0, 1.0), st.floats(1.5, 30.0), st.floats(-5.0, 0.0))
def test_between_the_fastest_local_growth_and_any_one_wave(
    power: float, speed: float, pull: float
) -> None:
    case = (1.0, 10.0**power, 1.0, speed, 2.0)
    gravity = 10.0**pull * speed
    found = jet.gravity_thinned_breakup_length(*case, gravity=gravity)
    # the fastest wave of each place, all the way: never slower than a real one
    wave = jet.most_unstable_wavelength_viscous_longwave(*case[:3], 2.0)
    one = jet.gravity_thinned_breakup_length(*case, wavelength=wave, gravity=gravity)
    assert found.length <= one.length * (1.0 + 1e-9)
    assert one.wavelength == pytest.approx(wave, rel=1e-12)
    h, time = case[1], (math.sqrt(1.0 + 2.0 * gravity * found.length / speed**2) - 1.0)
    time *= speed / gravity
    s = np.linspace(0.0, time, 4001)
    grown = 1.0 + gravity / speed * s
    local = grown**0.75 / (2.0 * math.sqrt(2.0) + 6.0 * h * grown**0.25)
    assert np.trapezoid(local, s) >= 10.0 * (1.0 - 1e-6)


@given(st.floats(-2.5, 1.0), st.floats(1.05, 3.0))
def test_what_lengthens_it(power: float, factor: float) -> None:
    case = {"density": 1000.0, "viscosity": 10.0**power, "surface_tension": 0.05}
    case |= {"velocity": 1.0, "jet_diameter": 1e-3}
    base = jet.gravity_thinned_breakup_length(**case).length
    thicker = {**case, "viscosity": factor * case["viscosity"]}
    assert jet.gravity_thinned_breakup_length(**thicker).length > base
    assert jet.gravity_thinned_breakup_length(**case, constant=10.0 * factor).length > base


def test_arrays_of_every_shape_and_a_given_wave_below_the_cut_off() -> None:
    speeds = np.array([[0.5], [2.0]])
    found = jet.gravity_thinned_breakup_length(1000.0, [1e-3, 0.1, 1.0], 0.05, speeds, 1e-3)
    assert found.length.shape == (2, 3)
    assert (np.diff(found.length, axis=1) > 0.0).all()
    with pytest.raises(OutOfRange, match="Weber number"):
        jet.gravity_thinned_breakup_length(1000.0, 1e-3, 0.05, 0.1, 1e-3)
    with pytest.raises(OutOfRange, match="of a given wave"):
        jet.gravity_thinned_breakup_length(1000.0, 1e-3, 0.05, 2.0, 1e-3, wavelength=3e-3)
    with pytest.raises(Unphysical, match="gravity"):
        jet.gravity_thinned_breakup_length(1000.0, 1e-3, 0.05, 2.0, 1e-3, gravity=-9.8)


# --- the stretched viscous limit -------------------------------------------------------------
powers = st.floats(0.2, 5.0)


@given(powers, powers, powers, powers)
def test_the_published_scaling(by_mu: float, by_gamma: float, by_q: float, by_g: float) -> None:
    """L ~ (g Q^2 mu^4/gamma^4)^(1/3) [S, abstract of Javadi et al. 2013]."""
    one = jet.stretched_viscous_breakup_length(1.0, 0.05, 1e-7)
    two = jet.stretched_viscous_breakup_length(
        by_mu, 0.05 * by_gamma, 1e-7 * by_q, gravity=9.80665 * by_g
    )
    expected = (by_g * by_q**2 * by_mu**4 / by_gamma**4) ** (1.0 / 3.0)
    assert two / one == pytest.approx(expected, rel=1e-12)


def test_the_limit_is_reached_from_the_jet_that_is_followed() -> None:
    """Ever more viscous and slower jets tend to the closed form, constant included [C]."""
    gaps = []
    for viscosity, velocity in ((1e1, 1e-1), (1e2, 1e-2), (1e3, 1e-3)):
        case = (1000.0, viscosity, 0.05, velocity, 1e-3)
        followed = jet.gravity_thinned_breakup_length(*case, outside="allow").length
        flow = jet.jet_flow(velocity, 1e-3)
        gaps.append(followed / jet.stretched_viscous_breakup_length(viscosity, 0.05, flow) - 1.0)
    assert abs(gaps[2]) < abs(gaps[1]) < abs(gaps[0])
    assert gaps == pytest.approx([0.033, 0.0042, 0.0005], abs=5e-4)
    tenth = jet.stretched_viscous_breakup_length(1.0, 0.05, 1e-7, constant=1.0)
    one = jet.stretched_viscous_breakup_length(1.0, 0.05, 1e-7, constant=10.0)
    assert one / tenth == pytest.approx(10.0 ** (4.0 / 3.0), rel=1e-12)
    group = (9.80665 * 1e-14 / 0.05**4) ** (1.0 / 3.0)
    assert one / group == pytest.approx(94.01, abs=0.01)
