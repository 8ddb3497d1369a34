"""Thickened solvents: viscosities against published ones, and how they behave as fluids."""

from __future__ import annotations

import math
import pickle
from typing import Any

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit.errors import BadInput, MissingProperty, OutOfRange, UnitError
from dropkit.properties.interface import Fluid
from dropkit.properties.thickened_fluid import Thickened

BRINE = dk.mixture({"sodium chloride": 0.00584, "water": "rest"}, by="mass")


def spread(fluid: Fluid, temperature: float = 293.15) -> float:
    found = fluid.uncertainty("viscosity", temperature)
    assert found is not None
    return float(found)


def alginate(**more: Any) -> Thickened:
    given_values: dict[str, Any] = {
        "concentration": 5.0,
        "molar_mass": 100.0,
        "salt": 100.0,
        **more,
    }
    return dk.thickened("water", "sodium alginate", **given_values)


# Donnan and Rose 1950 as the abstract gives it: kinematic viscosities of 2 and 20 cSt at 25 degC
# in 0.1 N sodium chloride, 0.25 % of alginate by mass, for intrinsic viscosities of 3.6 and
# 19.2 dL/g. The law's constant is from another laboratory's alginate (SaykoEtAl2021).
@pytest.mark.parametrize(("eta", "centistokes", "off"), [(3.6, 2.0, 0.03), (19.2, 20.0, 0.10)])
def test_alginate_against_a_study_that_the_entry_does_not_use(
    eta: float,
    centistokes: float,
    off: float,
) -> None:
    ink = dk.thickened(
        BRINE, "alginate", concentration=2.5, intrinsic_viscosity=(eta, "dL/g"), uncertainty=0.03
    )
    nu = ink.kinematic_viscosity(298.15)
    assert nu == pytest.approx(centistokes * 1e-6, rel=off)
    # The band with 3 % for the intrinsic viscosity holds the published value.
    assert abs(nu / (centistokes * 1e-6) - 1.0) < 2.0 * spread(ink, 298.15)


def test_the_solvent_brings_its_salt() -> None:
    from_solvent = dk.thickened(BRINE, "CMC", concentration=1.0, molar_mass=337.5)
    stated = dk.thickened("water", "CMC", concentration=1.0, molar_mass=337.5, salt="0.1 mol/L")
    assert from_solvent.relative_viscosity() == pytest.approx(stated.relative_viscosity(), rel=5e-3)
    assert any("salt's own effect" in text for text in stated.trail("viscosity").assumptions)
    assert not any("salt's own" in text for text in from_solvent.trail("viscosity").assumptions)
    with pytest.raises(BadInput, match="brings its own salt"):
        dk.thickened(BRINE, "CMC", concentration=1.0, molar_mass=337.5, salt=100.0)


def test_viscosity_is_that_of_the_solvent_times_one_factor() -> None:
    ink, water = alginate(), dk.liquid("water")
    factor = ink.relative_viscosity()
    # x = 5 * 0.3771, Martin's constant 0.289.
    x = 5.0 * 0.3771
    assert factor == pytest.approx(1.0 + x * math.exp(0.289 * x), rel=1e-12)
    T = np.linspace(289.0, 302.0, 7)
    assert ink.viscosity(T) == pytest.approx(factor * water.viscosity(T), rel=1e-12)
    assert ink.viscosity(293.15) == pytest.approx(factor * water.viscosity(293.15), rel=1e-12)
    assert ink.kinematic_viscosity(293.15) == pytest.approx(
        ink.viscosity(293.15) / water.density(293.15), rel=1e-12
    )


def test_units_come_back_in_the_trades() -> None:
    ink = alginate(concentration="0.5 g/dL", molar_mass="100 kDa", salt="0.1 mol/L")
    assert f"{ink.viscosity('20 degC'):.2f}" == "4.26 millipascal * second"
    with pytest.raises(UnitError, match="measures a pure number"):
        alginate(concentration="0.5 %")


def test_beyond_the_measured_concentrations_is_refused_with_what_is_allowed() -> None:
    with pytest.raises(OutOfRange, match=r"up to 29\.2 kg/m3, where c\[eta\] is 11"):
        alginate(concentration=30.0)
    assert alginate(concentration=29.0).viscosity(293.15) > 0.05
    # Poly(vinyl alcohol) associates: only where two sources agree is it given.
    with pytest.raises(OutOfRange):
        dk.thickened("water", "PVA", concentration="4 g/dL", molar_mass="75 kDa")


def test_temperatures_are_those_of_solvent_and_polymer() -> None:
    ink = alginate()
    assert (ink.range("viscosity").low, ink.range("viscosity").high) == (288.15, 303.15)
    assert ink.range("density") == dk.liquid("water").range("density")
    with pytest.raises(OutOfRange, match="15 to 30 degC"):
        ink.viscosity("60 degC")
    assert np.isnan(ink.viscosity(np.array([293.15, 350.0]), outside="nan"))[1]


def test_uncertainty_is_of_solvent_law_and_coil() -> None:
    plain = alginate()
    x, k = 5.0 * 0.3771, 0.289
    steep = x * (1 + k * x) * math.exp(k * x) / plain.relative_viscosity()
    water = spread(dk.liquid("water"))
    expected = math.hypot(math.hypot(water, 0.04), 0.4 * steep)
    assert plain.uncertainty("viscosity", 293.15) == pytest.approx(expected, rel=1e-9)
    own = dk.thickened("water", "alginate", concentration=5.0, intrinsic_viscosity=0.3771,
                       salt=100.0)  # fmt: skip
    assert own.viscosity(293.15) == pytest.approx(plain.viscosity(293.15), rel=1e-12)
    assert own.uncertainty("viscosity") is None
    assert own.grade("viscosity") == plain.grade("viscosity") == "single"
    thick, thin = alginate(concentration=20.0), alginate(concentration=0.1)
    assert spread(thick) > spread(plain)
    assert spread(thin) < 0.05


def test_what_a_surface_active_polymer_does_to_the_surface_is_not_guessed() -> None:
    ink = dk.thickened("water", "HPMC", concentration=0.5, molar_mass="430 kDa")
    assert "surface_tension" not in ink.available()
    with pytest.raises(MissingProperty, match="surface active"):
        ink.surface_tension(293.15)
    assert "surface active" in repr(ink)
    measured = ink.with_values(surface_tension="46 mN/m", at="20 degC")
    assert measured.surface_tension(293.15) == 0.046
    assert measured.viscosity(293.15) == ink.viscosity(293.15)


def test_of_the_others_it_is_the_solvents_and_says_so() -> None:
    ink = alginate()
    assert ink.surface_tension(293.15) == dk.liquid("water").surface_tension(293.15)
    trail = ink.trail("surface_tension", 293.15)
    assert trail.grade == "estimated"
    assert trail.uncertainty == 0.05
    assert any("polymer left out" in text for text in trail.assumptions)
    # The polymer's own mass: 5 kg/m3 of it, half of that as one standard uncertainty.
    assert ink.uncertainty("density", 293.15) == pytest.approx(0.0025, rel=1e-3)
    assert "electrical_conductivity" not in ink.available()
    assert "refractive_index" not in ink.available()


def test_shear_and_elasticity_are_told() -> None:
    ink = alginate()
    told = " ".join(ink.cautions)
    assert "zero-shear viscosity" in told
    assert "no relaxation time is given" in told
    assert "calcium" in told
    assert "zero-shear" in str(ink.trail("viscosity"))
    assert "caution: zero-shear" in str(ink.at("20 degC"))


def test_sources_are_those_of_solvent_and_polymer() -> None:
    ink = alginate()
    assert {"SaykoEtAl2021", "IAPWS2008viscosity"} <= set(ink.sources)
    assert ink.trail("viscosity").records[-1].record == (
        "thickeners/sodium_alginate: intrinsic_viscosity 1"
    )


def test_other_solvents_need_an_intrinsic_viscosity_of_their_own() -> None:
    glycol = dk.mixture({"glycerol": 0.3, "water": "rest"}, by="mass")
    for solvent in ("ethanol", glycol, dk.fluid("mine", viscosity=0.002, density=1000.0)):
        with pytest.raises(MissingProperty, match="in water only"):
            dk.thickened(solvent, "PEO", concentration=1.0, molar_mass=1000.0)
        ink = dk.thickened(solvent, "PEO", concentration=1.0, intrinsic_viscosity=0.4)
        assert any("that in water" in text for text in ink.trail("viscosity").assumptions)
        assert ink.relative_viscosity() == pytest.approx(1.0 + 0.4 * math.exp(0.215 * 0.4))


def test_an_array_of_compositions_is_thickened_by_the_same_factor() -> None:
    many = dk.mixture({"glycerol": np.array([0.1, 0.2, 0.3]), "water": "rest"}, by="mass")
    ink = dk.thickened(many, "PEO", concentration=1.0, intrinsic_viscosity=0.4)
    assert ink.viscosity(298.15) == pytest.approx(
        ink.relative_viscosity() * many.viscosity(298.15), rel=1e-12
    )
    salts = dk.mixture({"sodium chloride": np.array([0.01, 0.02]), "water": "rest"}, by="mass")
    with pytest.raises(BadInput, match="array of compositions"):
        dk.thickened(salts, "CMC", concentration=1.0, molar_mass=337.5)


def test_solvents_that_are_none() -> None:
    for odd in (None, 3.0, alginate()):
        with pytest.raises(BadInput, match="the solvent is"):
            dk.thickened(odd, "PEO", concentration=1.0, molar_mass=1000.0)
    with pytest.raises(MissingProperty):
        dk.thickened(dk.fluid("x", density=1000.0), "PEO", concentration=1.0,
                     intrinsic_viscosity=0.4)  # fmt: skip


def test_it_travels_is_searched_and_serves_numbers() -> None:
    ink = alginate()
    ink.viscosity(293.15)
    again = pickle.loads(pickle.dumps(ink))
    assert again.viscosity(295.0) == ink.viscosity(295.0)
    found = ink.find(viscosity="4 mPa*s")
    assert ink.viscosity(found.values[0]) == pytest.approx(4e-3, rel=1e-6)
    state = ink.at("20 degC").si()
    length = 50e-6
    expected = state.viscosity / math.sqrt(state.density * state.surface_tension * length)
    oh = dk.numbers.ohnesorge(state.density, state.viscosity, state.surface_tension, length)
    assert oh == pytest.approx(expected)


def test_poly_vinyl_alcohol_shrinks_with_warmth() -> None:
    ink = dk.thickened("water", "PVA", concentration="5 g/L", molar_mass="50 kDa")
    T = np.array([290.0, 305.0, 320.0])
    factors = ink.relative_viscosity(T)
    assert np.all(np.diff(factors) < 0)
    assert ink.viscosity(T) == pytest.approx(factors * dk.liquid("water").viscosity(T), rel=1e-12)


@given(st.floats(0.01, 29.0))
def test_thicker_with_concentration_and_never_thinner_than_the_solvent(c: float) -> None:
    ink, more = alginate(concentration=c), alginate(concentration=min(29.0, 1.1 * c))
    assert 1.0 < ink.relative_viscosity() <= more.relative_viscosity()
