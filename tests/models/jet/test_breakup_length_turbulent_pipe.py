"""Turbulent jets from long tubes: Grant & Middleman's line against four laboratories [S2]."""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import OutOfRange
from dropkit.models import jet
from dropkit.published_rows import published_file
from dropkit.records import data_dir


def ratios(study: str, *regimes: str, within: bool = True) -> np.ndarray:
    """Measured over calculated; rows out of range are not let through unless told."""
    found = published_file(data_dir() / "published" / "jets" / f"{study}.csv")
    kept = [row for row in found if row["regime"] in regimes]
    weber = np.array([float(row["We_d"]) for row in kept])
    reynolds = np.array([float(row["Re_d"]) for row in kept])
    model = jet.turbulent_pipe_breakup_length(
        1.0,
        np.sqrt(weber) / reynolds,
        1.0,
        np.sqrt(weber),
        1.0,
        outside="raise" if within else "allow",
    )
    return np.array([float(row["breakup_length_over_d"]) for row in kept]) / model


def test_closed_value() -> None:
    # We = 3482.478873 gives 115.700138 [C]
    found = jet.turbulent_pipe_breakup_length(1.0, 1e-3, 1.0, 3482.478873**0.5, 1.0)
    assert found == pytest.approx(115.700138, rel=1e-8)


@pytest.mark.parametrize(("speed", "measured"), [(20.0, 153.0), (30.0, 183.0), (40.0, 214.0)])
def test_grants_alcohol(speed: float, measured: float) -> None:
    """Table A-7 of Grant 1965, 95 % ethanol, 0.62 mm: within 15 %."""
    found = jet.turbulent_pipe_breakup_length(802.0, 1.32e-3, 0.0233, speed, 0.62e-3) / 0.62e-3
    assert found == pytest.approx(measured, rel=0.15)


@pytest.mark.parametrize(
    ("study", "regimes", "count", "bias", "rms"),
    [
        ("Grant1965_tables", ("second wind-induced", "S2A"), 17, 0.983, 0.088),
        ("Chen1962", ("second wind-induced",), 15, 1.002, 0.059),
        ("Phinney1975", ("",), 25, 1.043, 0.072),
        ("Sallam2002", ("second wind-induced",), 4, 0.982, 0.090),
    ],
)
def test_study_by_study(
    study: str, regimes: tuple[str, ...], count: int, bias: float, rms: float
) -> None:
    found = ratios(study, *regimes)
    assert found.size == count
    assert np.exp(np.log(found).mean()) == pytest.approx(bias, abs=0.001)
    assert np.sqrt((np.log(found) ** 2).mean()) == pytest.approx(rms, abs=0.001)


def test_beside_the_regime_jets_are_shorter() -> None:
    onset = ratios("Sallam2002", "R2S")
    assert np.exp(np.log(onset).mean()) == pytest.approx(0.71, abs=0.01)
    atomising = ratios("Sallam2002", "atomization", within=False)
    assert np.exp(np.log(atomising).mean()) == pytest.approx(0.79, abs=0.01)


@given(st.floats(1.01, 2.0))
def test_exponent_and_what_does_not_matter(factor: float) -> None:
    case = {"density": 1000.0, "viscosity": 1e-3, "surface_tension": 0.07}
    case |= {"velocity": 15.0, "jet_diameter": 2e-3}
    one = jet.turbulent_pipe_breakup_length(**case)
    faster = jet.turbulent_pipe_breakup_length(**{**case, "velocity": factor * 15.0})
    assert faster / one == pytest.approx(factor**0.64, rel=1e-12)
    assert jet.turbulent_pipe_breakup_length(**{**case, "viscosity": factor * 1e-3}) == one


def test_laminar_and_slow_jets_are_out_of_range() -> None:
    with pytest.raises(OutOfRange, match="Reynolds"):
        jet.turbulent_pipe_breakup_length(1000.0, 1e-3, 0.07, 20.0, 100e-6)
    with pytest.raises(OutOfRange, match="Weber"):
        jet.turbulent_pipe_breakup_length(1000.0, 1e-3, 0.07, 1.0, 5e-3)
