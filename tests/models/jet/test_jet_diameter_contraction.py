"""Contraction of a free jet: the momentum balances, done here by quadrature."""

from __future__ import annotations

import numpy as np
import pytest
from scipy.integrate import quad

from dropkit.errors import OutOfRange
from dropkit.models import jet


def contraction(profile: object) -> float:
    """d_jet/d_tube for a speed profile u(r), 0 <= r <= 1, that becomes flat."""
    mass = quad(lambda r: profile(r) * r, 0.0, 1.0)[0]  # type: ignore[operator]
    momentum = quad(lambda r: profile(r) ** 2 * r, 0.0, 1.0)[0]  # type: ignore[operator]
    # Flat jet: U = momentum/mass, area ratio = 2 mass/U.
    return float(np.sqrt(2.0 * mass * mass / momentum))


def test_laminar() -> None:
    d = jet.jet_diameter_laminar_pipe(1000.0, 1e-3, 1.0, 1e-3)
    assert d == pytest.approx(0.8660254038e-3, rel=1e-10)  # [C]; Harmon 1955
    assert d == pytest.approx(1e-3 * contraction(lambda r: 1.0 - r * r), rel=1e-9)
    # The jet then runs at 4/3 of the mean speed, and 1/9 of the kinetic energy is lost [C].
    speed = jet.jet_velocity(jet.jet_flow(1.0, 1e-3), d)
    assert speed == pytest.approx(4.0 / 3.0, rel=1e-12)
    assert 1.0 - speed**2 / 2.0 == pytest.approx(1.0 / 9.0, rel=1e-12)


def test_turbulent() -> None:
    d = jet.jet_diameter_turbulent_pipe(1000.0, 1e-3, 10.0, 1e-3)
    assert d == pytest.approx(0.9899494937e-3, rel=1e-10)  # [C]
    assert d == pytest.approx(1e-3 * contraction(lambda r: (1.0 - r) ** (1.0 / 7.0)), rel=1e-7)


def test_reynolds_number_decides() -> None:
    with pytest.raises(OutOfRange, match="Reynolds number"):
        jet.jet_diameter_laminar_pipe(1000.0, 1e-3, 10.0, 1e-3)  # 10 000
    with pytest.raises(OutOfRange, match="Reynolds number"):
        jet.jet_diameter_laminar_pipe(1000.0, 0.1, 1.0, 1e-3)  # 10: hardly contracts at all
    with pytest.raises(OutOfRange, match="Reynolds number"):
        jet.jet_diameter_turbulent_pipe(1000.0, 1e-3, 1.0, 1e-3)
    both = jet.jet_diameter_laminar_pipe(1000.0, 1e-3, np.array([1.0, 10.0]), 1e-3, outside="nan")
    assert np.isnan(both).tolist() == [False, True]
