"""Electric numbers: Rayleigh's limit, Taylor's limit recomputed, diameter against radius."""

from __future__ import annotations

import math

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers

EPS0 = 8.8541878128e-12  # F/m, CODATA 2018
size = st.floats(1e-7, 1e-2)
tension = st.floats(0.005, 2.0)


@pytest.mark.parametrize(
    ("radius", "limit"),
    # Project's reference, gamma = 72.8 mN/m: Rayleigh's limit 8 pi (eps0 gamma a^3)^(1/2).
    [(50e-6, 7.134029827e-12), (1e-6, 2.017808347e-14)],
)
def test_rayleighs_limit(radius: float, limit: float) -> None:
    ratio = numbers.rayleigh_charge_ratio(0.0728, 2 * radius, limit)
    assert ratio == pytest.approx(1.0, rel=1e-9)
    assert numbers.fissility(0.0728, 2 * radius, limit) == pytest.approx(1.0, rel=1e-9)


@given(tension, size)
def test_diameter_and_radius_form_of_the_limit_agree(gamma: float, d: float) -> None:
    # Commonly garbled: the radius in the form for the diameter, or the reverse.
    on_radius = 8 * math.pi * math.sqrt(EPS0 * gamma * (d / 2) ** 3)
    on_diameter = math.pi * math.sqrt(8 * EPS0 * gamma * d**3)
    assert on_radius == pytest.approx(on_diameter)
    assert numbers.rayleigh_charge_ratio(gamma, d, on_radius) == pytest.approx(1.0)
    # As quoted elsewhere: q^2 = 64 pi^2 eps0 gamma a^3.
    quoted = math.sqrt(64 * math.pi**2 * EPS0 * gamma * (d / 2) ** 3)
    assert numbers.fissility(gamma, d, quoted) == pytest.approx(1.0)


def test_surface_field_at_the_limit() -> None:
    # Project's reference: 2 (gamma / (eps0 a))^(1/2) = 25646985.02 V/m at 50 um.
    field = 7.134029827e-12 / (4 * math.pi * EPS0 * (50e-6) ** 2)
    assert field == pytest.approx(25646985.02, rel=1e-8)
    # At the limit the electric pressure balances the capillary one: eps0 E^2 / 2 = 2 gamma / a.
    bond = numbers.electric_bond_radius(0.0728, 50e-6, field)
    assert bond == pytest.approx(4.0)


@given(tension, size, st.floats(-1e-9, 1e-9))
def test_fissility_is_the_square(gamma: float, d: float, charge: float) -> None:
    ratio = numbers.rayleigh_charge_ratio(gamma, d, charge)
    assert numbers.fissility(gamma, d, charge) == pytest.approx(ratio**2)
    assert math.copysign(1.0, ratio) == math.copysign(1.0, charge)


def spheroid_field(aspect: float | np.ndarray) -> float | np.ndarray:
    """E (eps0 r0 / gamma)^(1/2) that holds a conducting spheroid, pole against equator.

    The field at the pole is E over the depolarisation factor, none acts at the equator, and the
    curvatures differ: eps0 (E / n)^2 / 2 = gamma (2 a / b^2 - 1 / b - b / a^2), a b^2 = r0^3.
    """
    e = np.sqrt(1 - 1 / aspect**2)
    factor = (1 - e**2) / e**3 * (np.arctanh(e) - e)
    b, a = aspect ** (-1 / 3), aspect ** (2 / 3)
    return factor * np.sqrt(2 * (2 * a / b**2 - 1 / b - b / a**2))


def test_taylors_limit_is_the_greatest_field_that_a_spheroid_withstands() -> None:
    # Taylor 1964: a drop becomes unstable at a length of 1.9 times its width (abstract seen) and
    # E (r0 / gamma)^(1/2) = 1.625 in Gaussian units [from memory]. Both follow from his method.
    aspects = np.linspace(1.2, 3.0, 18001)
    fields = spheroid_field(aspects)
    assert aspects[np.argmax(fields)] == pytest.approx(1.9, abs=0.05)
    assert fields.max() * math.sqrt(4 * math.pi) == pytest.approx(1.625, rel=5e-4)
    gamma, radius = 0.0728, 1e-3
    limit = fields.max() * math.sqrt(gamma / (EPS0 * radius))
    assert numbers.taylor_field_ratio(gamma, 2 * radius, limit) == pytest.approx(1.0, rel=5e-4)
    # For water of 1 mm radius that is 1.3 MV/m, below the breakdown of air at 3 MV/m.
    assert limit == pytest.approx(1.315e6, rel=1e-3)


@given(tension, size, st.floats(1e3, 1e8))
def test_the_field_ratio_and_the_electric_bond_number(gamma: float, d: float, e: float) -> None:
    bond = numbers.electric_bond(gamma, d, e)
    assert bond == pytest.approx(2 * numbers.electric_bond_radius(gamma, d / 2, e))
    ratio = numbers.taylor_field_ratio(gamma, d, e)
    # 1.625^2 / (4 pi) = 0.2101 on the radius.
    assert ratio**2 == pytest.approx(bond / 2 / (1.625**2 / (4 * math.pi)))
