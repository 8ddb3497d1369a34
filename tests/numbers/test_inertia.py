"""Numbers of inertia: check values with their sources, and what they are in limits."""

from __future__ import annotations

import math

import pytest

from dropkit import numbers


# Published: Asset and Bales 1951, as transcribed in the public compilation of pipe-jet breakup
# data by B. Trettel: printed Weber and Reynolds numbers of water jets, pp. 9-10, figs. 10-11.
# Their temperature is not told; water at 20 degC (998.2, 1.0016e-3, 72.74e-3 from IAPWS) and at
# 25 degC (997.0, 0.890e-3, 71.97e-3) bracket it.
@pytest.mark.parametrize(
    ("diameter", "speed", "printed_weber", "printed_reynolds"),
    [(0.00284, 1.62, 105.308644, 5050.0), (0.00981, 0.891, 108.16, 8910.0)],
)
def test_printed_jets_of_water(
    diameter: float, speed: float, printed_weber: float, printed_reynolds: float
) -> None:
    cold = numbers.reynolds(998.2, 1.0016e-3, speed, diameter)
    warm = numbers.reynolds(997.0, 0.890e-3, speed, diameter)
    assert 0.97 * cold < printed_reynolds < 1.03 * warm
    assert numbers.weber(998.2, 0.07274, speed, diameter) == pytest.approx(printed_weber, rel=0.04)


# Independent code: printed examples in the documentation of the open-source library fluids 1.3.1.
def test_examples_of_another_implementation() -> None:
    assert numbers.reynolds(1.1613, 1.9e-5, 2.5, 0.25) == pytest.approx(38200.65789473684)
    assert numbers.froude(1.83, 2.0, gravity=1.63) == pytest.approx(1.0135432593877318)
    # The same library's example of the squared form, which is not ours.
    assert numbers.froude(1.83, 2.0) ** 2 == pytest.approx(0.17074638128208924)
    assert numbers.strouhal(4.0, 2.0, 8.0) == 4.0
    assert numbers.cavitation_number(1000.0, 1e4, 10.0, 2e5) == pytest.approx(3.8)


# Computed in the project's reference: 30 um drop of 10 mPa s, 1000 kg/m3 at 6 m/s has Re = 18.
def test_reynolds_of_an_ink_drop() -> None:
    assert numbers.reynolds(1000.0, 0.010, 6.0, 30e-6) == pytest.approx(18.0)
    assert numbers.reynolds_radius(1000.0, 0.010, 6.0, 15e-6) == pytest.approx(9.0)


def test_gas_reynolds_is_reynolds_with_the_properties_of_the_gas() -> None:
    # Gunn and Kinzer 1949: a 1 mm drop falls at 4.03 m/s; air at 20 degC 1.205 kg/m3, 18.1 uPa s.
    ours = numbers.gas_reynolds(4.03, 1e-3, 1.205, 1.81e-5)
    assert ours == numbers.reynolds(1.205, 1.81e-5, 4.03, 1e-3)
    assert numbers.gas_reynolds(0.0, 1e-3, 1.205, 1.81e-5) == 0.0


def test_discharge_coefficient_of_a_loss_free_orifice_is_one() -> None:
    speed = math.sqrt(2 * 1e5 / 998.0)  # Bernoulli
    flow = speed * math.pi / 4 * 0.001**2
    assert numbers.discharge_coefficient(998.0, flow, 0.001, 1e5) == pytest.approx(1.0)


def test_discharge_through_the_vena_contracta() -> None:
    # Potential flow through a slot contracts to pi / (pi + 2) of the area: at the full speed of
    # Bernoulli the coefficient is that ratio.
    ratio = math.pi / (math.pi + 2)
    flow = ratio * math.sqrt(2 * 1e5 / 998.0) * math.pi / 4 * 0.001**2
    found = numbers.discharge_coefficient(998.0, flow, 0.001, 1e5)
    assert found == pytest.approx(0.6110154704, rel=1e-9)


def test_cavitation_number_uses_the_excess_over_the_vapour_pressure() -> None:
    assert numbers.cavitation_number(998.0, 2339.0, 20.0, 2339.0) == 0.0
    assert numbers.cavitation_number(998.0, 2339.0, 20.0, 1000.0) < 0.0


def test_an_absolute_pressure_is_asked_for() -> None:
    from dropkit.errors import UnitError

    with pytest.raises(UnitError):
        numbers.cavitation_number(998.0, 2339.0, 20.0, "2 barg")
