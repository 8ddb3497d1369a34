"""Weber numbers: liquid and gas, diameter and radius, and what they are commonly taken for."""

from __future__ import annotations

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit import numbers

size = st.floats(1e-6, 1e-2)
speed = st.floats(1e-3, 100.0)


# Sterling's thesis 1969, Tables IV-V, as transcribed by B. Trettel, with air of 1.18 kg/m3: the
# project's reference computed We_g on the jet diameter of 2.38 mm to the digits printed here.
@pytest.mark.parametrize(
    ("surface_tension", "velocity", "printed"),
    [
        (72.3e-3, 1.40, 0.08),
        (72.3e-3, 3.03, 0.36),
        (72.3e-3, 5.00, 0.97),
        (72.3e-3, 7.20, 2.01),
        (72.3e-3, 9.30, 3.36),
        (21.7e-3, 2.00, 0.52),
        (21.7e-3, 4.00, 2.07),
        (21.7e-3, 6.67, 5.76),
        (21.7e-3, 8.20, 8.70),
        (21.7e-3, 8.58, 9.53),
    ],
)
def test_gas_weber_of_sterlings_jets(
    surface_tension: float, velocity: float, printed: float
) -> None:
    assert numbers.gas_weber(surface_tension, velocity, 2.38e-3, 1.18) == pytest.approx(
        printed, abs=0.005 + 1e-9
    )


def test_weber_check_values() -> None:
    # Documentation of the open-source library fluids 1.3.1.
    assert numbers.weber(900.0, 0.01, 0.18, 0.001) == pytest.approx(2.916)
    # Computed in the project's reference: an ink drop at 6 m/s, and the slowest speed at which a
    # drop leaves a 25 um nozzle, We = 4 on the diameter.
    assert numbers.weber(1000.0, 0.030, 6.0, 30e-6) == pytest.approx(36.0)
    assert numbers.weber(1000.0, 0.030, 2.19089023, 25e-6) == pytest.approx(4.0, rel=1e-8)


@given(speed, size)
def test_diameter_is_twice_radius(velocity: float, diameter: float) -> None:
    weber = numbers.weber(998.0, 0.0728, velocity, diameter)
    assert weber == pytest.approx(2 * numbers.weber_radius(998.0, 0.0728, velocity, diameter / 2))
    gas = numbers.gas_weber(0.0728, velocity, diameter, 1.2)
    assert gas == pytest.approx(2 * numbers.gas_weber_radius(0.0728, velocity, diameter / 2, 1.2))


def test_gas_and_liquid_weber_differ_by_the_ratio_of_densities() -> None:
    # Commonly garbled: the "Weber number" of regime maps is the gas one.
    ratio = numbers.weber(998.0, 0.0728, 9.3, 2.38e-3) / numbers.gas_weber(
        0.0728, 9.3, 2.38e-3, 1.18
    )
    assert ratio == pytest.approx(998.0 / 1.18)


def test_absolute_instability_is_on_the_radius_and_the_others_on_the_diameter() -> None:
    # 3.12 on the radius is 6.25 on the diameter; the limit "8" is on the diameter.
    from dropkit.numbers.limits import LIMITS

    by_name = {(limit.number, limit.bounds) for limit in LIMITS}
    assert ("weber_radius", (3.12,)) in by_name
    assert ("weber", (8.0,)) in by_name
    assert ("weber", (3.12,)) not in by_name
    found = numbers.weber_radius(998.0, 0.0728, 2.0, 1e-4)
    assert numbers.weber(998.0, 0.0728, 2.0, 2e-4) / found == pytest.approx(6.25 / 3.125)
