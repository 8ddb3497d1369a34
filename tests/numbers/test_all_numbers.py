"""What holds for every number alike: scaling, units, powers, arrays, the words of the interface."""

from __future__ import annotations

import math
from typing import Any

import numpy as np
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from dropkit import numbers
from dropkit.numbers.catalogue import Entry, entries
from dropkit.unit_table import KINDS

ENTRIES = entries()
NAMES = [entry.name for entry in ENTRIES]
every_number = pytest.mark.parametrize("entry", ENTRIES, ids=NAMES)

# Steps of one part in a hundred at least: sums such as rho - rho_g then lose no more than two
# digits by cancellation, and equality can be asked for to nine.
steps = st.integers(1, 999)
# Seventy numbers times this many cases.
few = settings(max_examples=15)


def value_of(kind: str, step: int, power: int) -> float:
    """A value in the domain of a kind."""
    if KINDS[kind].domain == "0..1":
        return step / 1000
    return step / 100 * 10.0**power


@every_number
@few
@given(data=st.data())
def test_units_of_measurement_do_not_matter(entry: Entry, data: st.DataObject) -> None:
    """Metre, kilogram, second and kelvin by any factors leave each number as it was.

    The ampere follows from the others, so that the electric constant keeps its value: it stands
    inside the electric numbers as a number of SI.
    """
    function = entry.function
    factors = [10.0 ** data.draw(st.floats(-3, 3)) for _ in range(6)]
    metre, kilogram, second = factors[:3]
    factors[3] = math.sqrt(kilogram * metre**3 / second**4)
    before, after = {}, {}
    for word, kind in function.kinds.items():
        before[word] = value_of(kind, data.draw(steps), data.draw(st.integers(-2, 2)))
        after[word] = before[word] * scale(kind, factors)
    expected = function.si(**before) * scale(entry.returns, factors)
    assert function.si(**after) == pytest.approx(expected, rel=1e-9, abs=0.0)


def scale(kind: str, factors: list[float]) -> float:
    """By what a value of a kind grows when each base unit shrinks by its factor."""
    return math.prod(
        factor**exponent for factor, exponent in zip(factors, KINDS[kind].dimension, strict=True)
    )


@every_number
@few
@given(data=st.data())
def test_trade_units_give_the_same_as_si(entry: Entry, data: st.DataObject) -> None:
    function = entry.function
    bare = {
        word: value_of(kind, data.draw(steps), 0) * KINDS[kind].per_stock
        for word, kind in function.kinds.items()
    }
    carried: dict[str, Any] = {}
    for word, kind in function.kinds.items():
        unit = KINDS[kind].stock
        number = bare[word] / KINDS[kind].per_stock
        carried[word] = (number, unit) if unit else number
    expected = function(**bare)
    found = function(**carried)
    if KINDS[entry.returns].plain:
        assert isinstance(found, float)
    else:
        assert str(found.units)  # unit in, unit out
        found = found.to_base_units().magnitude
    assert found == pytest.approx(expected, rel=1e-9, abs=0.0)


# The powers in which the arguments enter: written down here from the definitions in the
# literature, apart from the code. They say how each number grows and falls, too.
POWERS: dict[str, dict[str, float]] = {
    "reynolds": {"density": 1, "viscosity": -1, "velocity": 1, "length": 1},
    "reynolds_radius": {"density": 1, "viscosity": -1, "velocity": 1, "radius": 1},
    "gas_reynolds": {"gas_density": 1, "gas_viscosity": -1, "velocity": 1, "length": 1},
    "froude": {"velocity": 1, "length": -0.5, "gravity": -0.5},
    "strouhal": {"frequency": 1, "length": 1, "velocity": -1},
    "discharge_coefficient": {"flow": 1, "length": -2, "pressure_drop": -0.5, "density": 0.5},
    "weber": {"density": 1, "surface_tension": -1, "velocity": 2, "length": 1},
    "weber_radius": {"density": 1, "surface_tension": -1, "velocity": 2, "radius": 1},
    "gas_weber": {"gas_density": 1, "surface_tension": -1, "velocity": 2, "length": 1},
    "gas_weber_radius": {"gas_density": 1, "surface_tension": -1, "velocity": 2, "radius": 1},
    "ohnesorge": {"viscosity": 1, "density": -0.5, "surface_tension": -0.5, "length": -0.5},
    "ohnesorge_radius": {"viscosity": 1, "density": -0.5, "surface_tension": -0.5, "radius": -0.5},
    "z_number": {"viscosity": -1, "density": 0.5, "surface_tension": 0.5, "length": 0.5},
    "laplace": {"viscosity": -2, "density": 1, "surface_tension": 1, "length": 1},
    "laplace_radius": {"viscosity": -2, "density": 1, "surface_tension": 1, "radius": 1},
    "capillary": {"viscosity": 1, "velocity": 1, "surface_tension": -1},
    "bond": {"density": 1, "gravity": 1, "length": 2, "surface_tension": -1},
    "bond_radius": {"density": 1, "gravity": 1, "radius": 2, "surface_tension": -1},
    "bond_root": {"density": 0.5, "gravity": 0.5, "length": 1, "surface_tension": -0.5},
    "galilei": {"gravity": 1, "density": 2, "length": 3, "viscosity": -2},
    "stokes": {"density": 1, "length": 2, "velocity": 1, "gas_viscosity": -1, "obstacle": -1},
    "knudsen": {"mean_free_path": 1, "radius": -1},
    "deborah": {"relaxation_time": 1, "density": -0.5, "surface_tension": 0.5, "radius": -1.5},
    "elastocapillary": {
        "relaxation_time": 1,
        "viscosity": -1,
        "surface_tension": 1,
        "radius": -1,
    },
    "weissenberg": {"relaxation_time": 1, "shear_rate": 1},
    "bingham": {"yield_stress": 1, "length": 1, "viscosity": -1, "velocity": -1},
    "prandtl": {"viscosity": 1, "heat_capacity": 1, "thermal_conductivity": -1},
    "schmidt": {"viscosity": 1, "density": -1, "diffusivity": -1},
    "lewis": {
        "thermal_conductivity": 1,
        "density": -1,
        "heat_capacity": -1,
        "diffusivity": -1,
    },
    "peclet": {"velocity": 1, "length": 1, "diffusivity": -1},
    "peclet_heat": {
        "density": 1,
        "heat_capacity": 1,
        "velocity": 1,
        "length": 1,
        "thermal_conductivity": -1,
    },
    "peclet_evaporation": {"evaporation_constant": 1, "diffusivity": -1},
    "fourier": {
        "thermal_conductivity": 1,
        "time": 1,
        "density": -1,
        "heat_capacity": -1,
        "length": -2,
    },
    "fourier_mass": {"diffusivity": 1, "time": 1, "length": -2},
    "sherwood": {"mass_transfer_coefficient": 1, "length": 1, "diffusivity": -1},
    "nusselt": {"heat_transfer_coefficient": 1, "length": 1, "thermal_conductivity": -1},
    "biot": {"heat_transfer_coefficient": 1, "length": 1, "thermal_conductivity": -1},
    "spalding_heat": {
        "vapour_heat_capacity": 1,
        "temperature_difference": 1,
        "heat_of_vaporisation": -1,
    },
    "jakob": {"heat_capacity": 1, "temperature_difference": 1, "heat_of_vaporisation": -1},
    "stefan": {"heat_capacity": 1, "temperature_difference": 1, "heat_of_fusion": -1},
    "marangoni": {
        "surface_tension_slope": 1,
        "temperature_difference": 1,
        "length": 1,
        "viscosity": -1,
        "thermal_diffusivity": -1,
    },
    "marangoni_mass": {
        "surface_tension_difference": 1,
        "length": 1,
        "viscosity": -1,
        "diffusivity": -1,
    },
    "electric_bond": {"electric_field": 2, "length": 1, "surface_tension": -1},
    "electric_bond_radius": {"electric_field": 2, "radius": 1, "surface_tension": -1},
    "rayleigh_charge_ratio": {"charge": 1, "surface_tension": -0.5, "length": -1.5},
    "fissility": {"charge": 2, "surface_tension": -1, "length": -3},
    "taylor_field_ratio": {"electric_field": 1, "length": 0.5, "surface_tension": -0.5},
    "splash_parameter": {
        "density": 0.75,
        "velocity": 1.25,
        "length": 0.75,
        "surface_tension": -0.5,
        "viscosity": -0.25,
    },
    "reduced_wavenumber": {"radius": 1, "wavelength": -1},
    "wavelength_ratio": {"wavelength": 1, "length": -1},
    "capillary_length": {"surface_tension": 0.5, "density": -0.5, "gravity": -0.5},
    "visco_capillary_length": {"viscosity": 2, "density": -1, "surface_tension": -1},
    "viscous_length": {"viscosity": 0.5, "time": 0.5, "density": -0.5},
    "inertio_capillary_length": {
        "surface_tension": 1 / 3,
        "time": 2 / 3,
        "density": -1 / 3,
    },
    "visco_capillary_velocity": {"surface_tension": 1, "viscosity": -1},
    "inertio_capillary_velocity": {"surface_tension": 0.5, "density": -0.5, "length": -0.5},
    "inertio_capillary_velocity_radius": {
        "surface_tension": 0.5,
        "density": -0.5,
        "radius": -0.5,
    },
    "capillary_time": {"surface_tension": 0.25, "density": -0.25, "gravity": -0.75},
    "viscous_time": {"density": 1, "length": 2, "viscosity": -1},
    "viscous_time_radius": {"density": 1, "radius": 2, "viscosity": -1},
    "inertio_capillary_time": {"density": 0.5, "length": 1.5, "surface_tension": -0.5},
    "inertio_capillary_time_radius": {"density": 0.5, "radius": 1.5, "surface_tension": -0.5},
    "visco_capillary_time": {"viscosity": 1, "length": 1, "surface_tension": -1},
    "visco_capillary_time_radius": {"viscosity": 1, "radius": 1, "surface_tension": -1},
}
# Those that hold a difference are no products of powers: numbers and signs of their slopes.
SLOPES: dict[str, dict[str, int]] = {
    "cavitation_number": {
        "absolute_pressure": 1,
        "vapour_pressure": -1,
        "velocity": -1,
        "density": -1,
    },
    "morton": {"gas_density": -1, "viscosity": 1, "surface_tension": -1, "gravity": 1},
    "archimedes": {"density": 1, "length": 1, "gas_viscosity": -1, "gravity": 1},
    "spalding_mass": {"surface_mass_fraction": 1, "far_mass_fraction": -1},
}


@pytest.mark.parametrize("name", POWERS)
@few
@given(data=st.data())
def test_powers_of_the_arguments(name: str, data: st.DataObject) -> None:
    function = getattr(numbers, name)
    assert set(POWERS[name]) == set(function.kinds)
    base = {word: value_of(kind, data.draw(steps), 0) for word, kind in function.kinds.items()}
    before = function.si(**base)
    for word, power in POWERS[name].items():
        grown = function.si(**{**base, word: base[word] * 3.0})
        assert grown == pytest.approx(before * 3.0**power, rel=1e-9, abs=0.0)


@pytest.mark.parametrize("name", SLOPES)
@few
@given(data=st.data())
def test_slopes_of_those_with_a_difference(name: str, data: st.DataObject) -> None:
    function = getattr(numbers, name)
    base = {word: value_of(kind, data.draw(steps), 0) for word, kind in function.kinds.items()}
    # Their signs hold while the difference is positive.
    base |= {"vapour_pressure": 1e-3} if "vapour_pressure" in base else {}
    base |= {"gas_density": base["density"] * 1e-3} if "gas_density" in base else {}
    base |= {"far_mass_fraction": 1e-4} if "far_mass_fraction" in base else {}
    before = function.si(**base)
    for word, sign in SLOPES[name].items():
        after = function.si(**{**base, word: base[word] * 1.0001})
        assert (after - before) * sign > 0


def test_every_number_is_in_one_of_the_two_lists() -> None:
    assert sorted([*POWERS, *SLOPES]) == sorted(NAMES)


@every_number
def test_the_core_is_one_body_for_floats_and_arrays(entry: Entry) -> None:
    function = entry.function
    rng = np.random.default_rng(7)
    columns = {word: rng.uniform(0.1, 0.9, 50) for word in function.kinds}
    whole = function.si(**columns)
    each = [
        function.si(**{word: float(column[i]) for word, column in columns.items()})
        for i in range(50)
    ]
    # A power by numpy may differ from one by the C library in the last places.
    np.testing.assert_allclose(whole, each, rtol=4 * np.finfo(float).eps, atol=0)


ORDER = [
    "density",
    "viscosity",
    "surface_tension",
    "velocity",
    "length",
]


@every_number
def test_arguments_stand_in_the_order_of_the_library(entry: Entry) -> None:
    ranked = [ORDER.index(w.replace("radius", "length")) for w in entry.arguments
              if w.replace("radius", "length") in ORDER]  # fmt: skip
    assert ranked == sorted(ranked)
    surroundings = {"gas_density", "gas_viscosity", "mean_free_path", "gravity"}
    seen = [word in surroundings for word in entry.arguments]
    assert seen == sorted(seen), "what surrounds the liquid comes last"
    assert not {"length", "radius"} <= set(entry.arguments), "one size: the diameter or the radius"


def test_fixed_signatures() -> None:
    by_name = {entry.name: entry.arguments for entry in ENTRIES}
    assert by_name["weber"] == ("density", "surface_tension", "velocity", "length")
    assert by_name["reynolds"] == ("density", "viscosity", "velocity", "length")
    assert by_name["ohnesorge"] == ("density", "viscosity", "surface_tension", "length")
