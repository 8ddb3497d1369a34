"""The published curves of the drop weight factor against each other and against weighed drops.

Marks: [S] seen in the source, [S2] in someone else's copy, [M+] remembered with a check, [C] computed.
"""

from __future__ import annotations

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import OutOfRange
from dropkit.models import dripping
from dropkit.published_rows import published_file
from dropkit.records import data_dir

PUBLISHED = data_dir() / "published" / "dripping"
TABLE = np.array(
    [
        [float(row["tip_ratio"]), float(row["drop_weight_factor"])]
        for row in published_file(PUBLISHED / "HarkinsBrown1919.csv")
    ]
)
MEASURED = TABLE[1:]


def test_table_entries_are_given_back() -> None:
    assert len(MEASURED) == 19
    np.testing.assert_allclose(
        dripping.drop_weight_factor(MEASURED[:, 0]), MEASURED[:, 1], rtol=1e-12
    )
    # The limit of a vanishing tip: all of the ideal drop falls.
    assert dripping.drop_weight_factor(1e-9) == pytest.approx(1.0, abs=1e-8)


@pytest.mark.parametrize(
    ("function", "largest"),
    [
        (dripping.drop_weight_factor_quadratic, 0.013),
        (dripping.drop_weight_factor_polynomial, 0.0125),
    ],
)
def test_fits_lie_on_the_table(function: object, largest: float) -> None:
    ratio = function(MEASURED[:, 0]) / MEASURED[:, 1] - 1.0  # type: ignore[operator]
    assert np.abs(ratio).max() < largest
    # Reach of 1 % of the table, but at the ends: 0.30 of both, and 1.20 of the polynomial.
    inner = (MEASURED[:, 0] > 0.31) & (MEASURED[:, 0] < 1.19)
    assert np.abs(ratio[inner]).max() < 0.01


def test_fits_in_closed_values() -> None:
    # Heertjes et al. 1971 [S2]: 0.6009 and 0.6108 [C].
    assert dripping.drop_weight_factor_quadratic(0.85) == pytest.approx(0.6009, abs=5e-5)
    assert dripping.drop_weight_factor_quadratic(1.0) == pytest.approx(0.6108, abs=5e-5)
    # Lee, Chan & Pogaku 2008 [M+]: the coefficients sum to 0.6119 at 1.
    assert dripping.drop_weight_factor_polynomial(1.0) == pytest.approx(0.6119, abs=1e-12)
    # Yildirim et al. 2005 [M+]: rho g r^2/gamma = 3.60 phi^2.81 is 2 pi phi^3 psi.
    bond = 2.0 * np.pi * 0.5**3 * dripping.drop_weight_factor_power(0.5)
    assert bond == pytest.approx(3.60 * 0.5**2.81, rel=1e-13)


def test_power_law_where_it_is_used() -> None:
    held = MEASURED[MEASURED[:, 0] < 0.801]
    ratio = dripping.drop_weight_factor_power(held[:, 0]) / held[:, 1] - 1.0
    assert np.abs(ratio).max() < 0.0105
    with pytest.raises(OutOfRange, match="tip radius"):
        dripping.drop_weight_factor_power(0.85)


def test_rayleighs_seven_drops() -> None:
    """Rayleigh 1899, as printed in the Encyclopaedia Britannica, 1911 [S]: slow water drops."""
    rows = published_file(PUBLISHED / "Rayleigh1899.csv")
    reciprocal = np.array([float(row["T_over_g_sigma_a2"]) for row in rows])
    weight = np.array([float(row["gM_over_Ta"]) for row in rows])
    ratio = (reciprocal * weight) ** (-1.0 / 3.0)
    assert ratio.min() == pytest.approx(0.454, abs=1e-3)
    assert ratio.max() == pytest.approx(1.134, abs=1e-3)
    share = weight / (2.0 * np.pi)
    for function, rms, worst in (
        (dripping.drop_weight_factor, 0.0102, 0.0151),
        (dripping.drop_weight_factor_polynomial, 0.0097, 0.0144),
        (dripping.drop_weight_factor_quadratic, 0.0110, 0.0169),
    ):
        departure = share / function(ratio) - 1.0
        assert np.sqrt(np.mean(departure**2)) == pytest.approx(rms, abs=1e-4)
        assert np.abs(departure).max() == pytest.approx(worst, abs=1e-4)
        assert abs(departure.mean()) < 0.002
    # The volume that the tip alone foretells, without the drop being known.
    foretold = dripping.drop_volume_tip(1.0, reciprocal, 2.0, 1.0) / reciprocal
    departure = weight / foretold - 1.0
    assert np.sqrt(np.mean(departure**2)) == pytest.approx(0.0100, abs=1e-4)
    # His rule 3.8 r gamma holds within 9 %.
    assert np.abs(weight / 3.8 - 1.0).max() < 0.09


def test_spread_of_the_curves() -> None:
    table = dripping.drop_weight_factors_compared(np.linspace(0.02, 1.2, 119))
    assert list(table.columns) == ["table", "quadratic", "polynomial", "power", "spread"]
    assert table["spread"].loc[0.4:].max() == pytest.approx(0.0133, abs=1e-4)
    assert table["spread"].loc[0.3:0.4].max() == pytest.approx(0.0203, abs=1e-3)
    assert table["spread"].loc[:0.299].max() == pytest.approx(0.0500, abs=1e-3)
    assert table["quadratic"].loc[:0.29].isna().all()
    assert table["power"].loc[0.81:].isna().all()
    one = dripping.drop_weight_factors_compared(0.5)
    assert one.shape == (1, 5)


@given(ratio=st.floats(1e-6, 1.2))
def test_a_wider_tip_always_gives_a_larger_number(ratio: float) -> None:
    """What the solution rests on: phi^3 psi and phi psi rise with phi on every curve."""
    step = np.array([ratio, min(ratio * 1.001, 1.2)])
    for function, low, high in (
        (dripping.drop_weight_factor, 0.0, 1.2),
        (dripping.drop_weight_factor_polynomial, 0.0, 1.2),
        (dripping.drop_weight_factor_quadratic, 0.3, 1.2),
        (dripping.drop_weight_factor_power, 0.1, 0.8),
    ):
        if not low <= step[0] < step[1] <= high:
            continue
        psi = function(step)
        assert np.diff(step**3 * psi)[0] > 0.0
        assert np.diff(step * psi)[0] > 0.0


def test_outside_the_table() -> None:
    with pytest.raises(OutOfRange, match=r"1\.3"):
        dripping.drop_weight_factor(1.3)
    assert np.isnan(dripping.drop_weight_factor(1.3, outside="nan"))
    # Allowed, the last stretch of the table goes on.
    assert dripping.drop_weight_factor(1.25, outside="allow") == pytest.approx(0.6663, abs=1e-10)
