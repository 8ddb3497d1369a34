"""Stokes and Knudsen numbers: check values, and the radius of the Knudsen number."""

from __future__ import annotations

import math

import pytest

from dropkit import numbers


def test_stokes_of_another_implementation() -> None:
    # Documentation of the open-source library fluids 1.3.1.
    assert numbers.stokes(1000.0, 0.9, 1e-5, 1e-3, 1e-5) == pytest.approx(0.5)


def test_stokes_is_the_stopping_distance_over_the_obstacle() -> None:
    # Relaxation time rho d^2 / (18 mu); the published settling speed of a 10 um sphere of unit
    # density, 3.06e-3 m/s (Hinds' Table A.11 as quoted), is that time times g, with 1.3 % slip.
    relaxation = numbers.stokes(1000.0, 1.0, 10e-6, 1.0, 1.81e-5)
    assert relaxation * 9.81 == pytest.approx(3.06e-3, rel=0.02)


@pytest.mark.parametrize(
    ("diameter", "published"),
    # Seinfeld and Pandis 2006, Table 9.3, 298 K, as quoted: slip corrections.
    [(0.01e-6, 22.2), (0.1e-6, 2.85), (1e-6, 1.164), (10e-6, 1.016)],
)
def test_knudsen_on_the_radius_gives_the_published_slip(diameter: float, published: float) -> None:
    # Davies' coefficients 1.257, 0.400, 1.10 belong to the mean free path over the RADIUS;
    # mean free path 0.0651 um at 298 K as quoted with that table.
    kn = numbers.knudsen(diameter / 2, 0.0651e-6)
    slip = 1 + kn * (1.257 + 0.400 * math.exp(-1.10 / kn))
    assert slip == pytest.approx(published, rel=0.005)
    # Commonly garbled: with the number on the diameter the small ones come out wrong.
    if diameter < 1e-6:
        half = kn / 2
        wrong = 1 + half * (1.257 + 0.400 * math.exp(-1.10 / half))
        assert wrong != pytest.approx(published, rel=0.1)
