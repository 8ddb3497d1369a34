"""Satellites: the table of shares against a simulation run here, and the published statements.

Marks: [C] computed from the long-wave equations; [S] seen in an abstract.
"""

from __future__ import annotations

import math
from typing import Any

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy.integrate import solve_ivp

from dropkit.errors import BadInput, OutOfRange, UnitError, Unphysical
from dropkit.models import jet
from dropkit.models.published import MARKS
from dropkit.records import data_dir

INK = (1020.0, 4.0e-3, 0.036, 60e-6)  # invented


def simulated_share(ohnesorge: float, x: float, start: float, cells: int = 100) -> float:
    """Share of a wavelength outside the main drop at pinch-off [C].

    Half a wavelength between symmetric ends, area in cells and speed on faces; radius, density and
    surface tension are 1. The wave starts with the speed of its growing mode.
    """
    length = math.pi / x
    dz = length / cells
    z = (np.arange(cells) + 0.5) * dz
    damping, drive = 1.5 * ohnesorge * x * x, 0.5 * x * x * (1.0 - x * x)
    growth = drive / (damping + math.sqrt(damping**2 + drive))
    state = np.zeros(2 * cells - 1)  # interleaved, so that the matrix is a band
    state[0::2] = (math.sqrt(1.0 - 0.5 * start**2) + start * np.cos(x * z)) ** 2
    state[1::2] = -2.0 * growth * start / x * np.sin(x * z[:-1] + 0.5 * x * dz)

    def rates(_: float, state: Any) -> Any:
        area = state[0::2]
        speed = np.concatenate(([0.0], state[1::2], [0.0]))
        h = np.sqrt(np.maximum(area, 1e-12))
        wide = np.concatenate((h[:1], h, h[-1:]))
        slope = (wide[2:] - wide[:-2]) / (2.0 * dz)
        bend = (wide[2:] - 2.0 * h + wide[:-2]) / dz**2
        arc = np.sqrt(1.0 + slope**2)
        curvature = 1.0 / (h * arc) - bend / arc**3
        faces = np.concatenate((area[:1], 0.5 * (area[1:] + area[:-1]), area[-1:]))
        pull = 3.0 * ohnesorge * area * np.diff(speed) / dz
        middle = 0.5 * (speed[1:] + speed[:-1])
        out = np.empty_like(state)
        out[0::2] = -np.diff(faces * speed) / dz
        out[1::2] = (
            -np.diff(curvature) / dz
            + np.diff(pull) / (dz * faces[1:-1])
            - np.diff(middle**2) / (2.0 * dz)
        )
        return out

    def pinched(_: float, state: Any) -> float:
        return float(state[0::2].min()) - 0.002**2

    pinched.terminal = True
    run = solve_ivp(
        rates, (0.0, 1e3), state, "LSODA", rtol=1e-5, atol=1e-8, lband=5, uband=5, events=pinched
    )
    assert run.status == 1
    area = run.y[0::2, -1]
    return float(area[area.argmin() + 1 :].sum() / area.sum())


def of(ohnesorge: float, x: float, start: float) -> tuple[float, ...]:
    """A jet of radius, density and surface tension 1."""
    return (1.0, ohnesorge, 1.0, 2.0, 2.0 * math.pi / x, start)


@pytest.mark.parametrize(
    ("ohnesorge", "x", "start", "apart"),
    [
        (0.02, 0.7, 0.05, 0.01),  # a point of the table: cells only
        (0.08, 0.5, 0.01, 0.01),
        (0.012, 0.62, 0.02, 0.05),  # between its points
        (0.04, 0.45, 0.08, 0.05),
        (0.15, 0.66, 0.003, 0.05),
    ],
)
def test_share_against_a_simulation(ohnesorge: float, x: float, start: float, apart: float) -> None:
    found = jet.satellite_volume_share(*of(ohnesorge, x, start))
    assert found == pytest.approx(simulated_share(ohnesorge, x, start), rel=apart)


@given(st.floats(0.005, 0.15), st.floats(0.32, 0.85), st.floats(0.001, 0.1), st.floats(1.02, 1.5))
def test_satellites_shrink_as_the_wave_gets_shorter(
    ohnesorge: float, x: float, start: float, factor: float
) -> None:
    """What Goedde & Yuen 1970 report of ligaments [S]; and viscosity leaves less."""
    shorter = min(factor * x, 0.9)
    one = jet.satellite_volume_share(*of(ohnesorge, x, start))
    assert jet.satellite_volume_share(*of(ohnesorge, shorter, start)) < one
    assert jet.satellite_volume_share(*of(factor * ohnesorge, x, start)) < one
    assert 0.0 < one < 0.4


@given(st.floats(0.32, 0.88), st.floats(0.001, 0.2))
def test_diameter_is_that_of_the_share(x: float, start: float) -> None:
    share = jet.satellite_volume_share(*of(0.05, x, start))
    small = jet.satellite_diameter(*of(0.05, x, start))
    main = jet.drop_diameter_from_wavelength(2.0, 2.0 * math.pi / x)
    assert (small / main) ** 3 == pytest.approx(share, rel=1e-12)


@pytest.mark.parametrize(
    ("wave", "start", "viscosity", "what"),
    [
        (200e-6, 1e-6, 4e-3, "reduced wavenumber"),
        (700e-6, 1e-6, 4e-3, "reduced wavenumber"),
        (280e-6, 1e-9, 4e-3, "radius amplitude"),
        (280e-6, 9e-6, 4e-3, "radius amplitude"),
        (280e-6, 1e-6, 0.1, "Ohnesorge number on the jet RADIUS"),
    ],
)
def test_no_number_outside_what_was_computed(
    wave: float, start: float, viscosity: float, what: str
) -> None:
    liquid = (INK[0], viscosity, *INK[2:])
    for function in (jet.satellite_volume_share, jet.satellite_diameter):
        with pytest.raises(OutOfRange, match=what):
            function(*liquid, wave, start)
        assert math.isnan(function(*liquid, wave, start, outside="nan"))


# --- statements ------------------------------------------------------------------------------
def test_every_statement_says_where_it_is_from() -> None:
    found = jet.satellite_statements(60e-6, 280e-6)
    assert {statement.about for statement in found} == {"when", "size", "merging", "drive"}
    for statement in found:
        assert statement.mark in MARKS
        assert statement.says
        assert statement.holds
        assert type(statement.applies) is bool
        if statement.mark == "M":
            assert statement.source == ""
        else:
            assert (data_dir() / "sources" / f"{statement.source}.toml").exists()


@pytest.mark.parametrize(
    ("spacing", "fewest"), [(3.2, False), (4.9, False), (5.1, True), (6.9, True), (7.1, False)]
)
def test_fewest_satellites_from_5_to_7_diameters(spacing: float, fewest: bool) -> None:
    """Pimbley & Lee 1977 [S, abstract]."""
    assert jet.drop_spacing(60e-6, spacing * 60e-6) == pytest.approx(spacing, rel=1e-12)
    when = jet.satellite_statements(60e-6, spacing * 60e-6)[0]
    assert when.source == "PimbleyLee1977"
    assert when.applies is fewest


def test_statements_for_many_jets_and_units() -> None:
    found = jet.satellite_statements("60 um", np.array([150e-6, 280e-6, 360e-6]))
    assert found[0].applies.tolist() == [False, False, True]
    assert found[1].applies.tolist() == [False, True, True]  # no wave grows below pi diameters
    assert found[4].applies.tolist() == [False, True, False]
    assert jet.satellite_statements("60 um", "0.36 mm")[0].applies is True


def test_statements_refuse_what_is_no_length() -> None:
    with pytest.raises(UnitError, match="wavelength"):
        jet.satellite_statements(60e-6, "3 V")
    with pytest.raises(Unphysical, match="jet_diameter"):
        jet.satellite_statements(-1.0, 280e-6)
    with pytest.raises(BadInput):
        jet.satellite_statements(60e-6, "wide")
