"""Growth with the pull of the gas: closed values, Sterling's measured lengths, limits.

Marks: [C] computed elsewhere from the stated formula; [S2] measured, as someone else transcribed it.
"""

from __future__ import annotations

import math
from typing import Any

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st
from scipy.optimize import minimize_scalar
from scipy.special import kv

from dropkit.errors import OutOfRange, UnknownName
from dropkit.models import jet
from dropkit.published_rows import published_file
from dropkit.records import data_dir

COEFFICIENT = {"weber": 1.0, "sterling": 0.175}


def reduced(oh: Any, gas_weber: Any) -> tuple[Any, ...]:
    """Density, viscosity, tension, speed and diameter of a jet with rho = gamma = a = 1, and the
    gas's density; both numbers on the radius."""
    return 1.0, oh, 1.0, 1.0, 2.0, gas_weber


def growth(x: Any, oh: Any, gas_weber: Any, **options: Any) -> Any:
    jet_, gas = reduced(oh, gas_weber)[:-1], gas_weber
    return jet.growth_rate_aerodynamic(*jet_, 2.0 * math.pi / x, gas, **options)


@pytest.mark.parametrize(
    ("form", "gas_weber", "x", "most"),
    [("weber", 0.5, 0.77447248, 0.3611862926), ("sterling", 1.0, 0.68434653, 0.3130772058)],  # [C]
)
def test_closed_maxima(form: Any, gas_weber: float, x: float, most: float) -> None:
    where = jet.most_unstable_wavelength_aerodynamic(
        *reduced(0.1, gas_weber), form=form, outside="allow"
    )
    assert 2.0 * math.pi / where == pytest.approx(x, abs=6e-9)
    found = jet.maximum_growth_aerodynamic(*reduced(0.1, gas_weber), form=form, outside="allow")
    assert found == pytest.approx(most, rel=2e-10)


def test_closed_value() -> None:
    assert growth(0.7, 0.1, 1.0) == pytest.approx(0.3127991231, rel=2e-10)  # [C]


rows = [
    row
    for row in published_file(data_dir() / "published" / "jets" / "Sterling1969.csv")
    if float(row["nozzle_L_over_d"]) < 1.0
]


def sterling(form: str) -> tuple[Any, Any]:
    """Formula over measured length, ln(a/eps0) = 15.2 for all, and the gas Weber number."""
    words = ("density_kg_m3", "viscosity_Pa_s", "surface_tension_N_m", "speed_m_s")
    rho, mu, gamma, speed = (np.array([float(row[word]) for row in rows]) for word in words)
    d = np.array([float(row["jet_diameter_m"]) for row in rows])
    measured = np.array([float(row["breakup_length_over_d"]) for row in rows])
    w = jet.maximum_growth_aerodynamic(rho, mu, gamma, speed, d, 1.18, form=form, outside="allow")
    return speed * 15.2 / (w * d) / measured, 1.18 * speed**2 * d / gamma


def test_lengths_of_jets_from_a_sharp_orifice_sterling_1969() -> None:  # [S2], 21 rows
    ratio, weber = sterling("sterling")
    assert len(ratio) == 21
    assert np.abs(ratio - 1.0).max() < 0.15
    assert np.sqrt(np.mean(np.log(ratio) ** 2)) == pytest.approx(0.053, abs=0.001)
    assert np.mean(np.log(ratio)) == pytest.approx(-0.013, abs=0.001)
    assert weber.max() < 10.0


def test_webers_form_is_far_too_short_where_gas_counts() -> None:  # [S2]
    ratio, weber = sterling("weber")
    assert np.abs(ratio[weber < 0.47] - 1.0).max() < 0.08
    assert ratio[(weber > 0.9) & (weber < 1.1)].min() == pytest.approx(0.75, abs=0.01)
    assert 6.5 < 1.0 / ratio[weber > 8.5].max() < 8.0


@given(st.floats(-6, 3), st.floats(1e-6, 9.9), st.sampled_from(["weber", "sterling"]))
def test_the_fastest_wave_by_another_search(power: float, gas: float, form: Any) -> None:
    oh, c = 10.0**power, COEFFICIENT[form]

    def squared_free(x: float) -> float:
        drive = x**2 * (1 - x**2) / 2 + c * gas / 2 * x**3 * kv(0, x) / (2 * kv(1, x))
        return float(-2 * drive / (3 * oh * x**2 + np.sqrt(9 * oh**2 * x**4 + 4 * drive)))

    jet_ = reduced(oh, 0.5 * gas)
    end = 2 * math.pi / jet.cut_off_wavelength_aerodynamic(*jet_[2:], form=form, outside="allow")
    best = minimize_scalar(squared_free, bounds=(0.0, end), method="bounded")
    options = {"form": form, "outside": "allow"}
    most = jet.maximum_growth_aerodynamic(*jet_, **options)
    assert most == pytest.approx(-best.fun, rel=1e-7)
    wave = jet.most_unstable_wavelength_aerodynamic(*jet_, **options)
    assert growth(2 * math.pi / wave, oh, 0.5 * gas, **options) == pytest.approx(most, rel=1e-13)
    for near in (0.999, 1.001):
        there = growth(near * 2 * math.pi / wave, oh, 0.5 * gas, **options)
        assert there <= most * (1 + 1e-14)


@given(st.floats(-6, 4), st.floats(0.01, 0.99))
def test_without_gas_it_is_webers_equation(power: float, x: float) -> None:
    liquid = (1.0, 10.0**power, 1.0, 2.0)
    wave = 2.0 * math.pi / x
    still = jet.growth_rate_viscous_longwave(*liquid, wave)
    assert growth(x, 10.0**power, 1e-14) == pytest.approx(still, rel=1e-11)
    most = jet.maximum_growth_aerodynamic(*reduced(10.0**power, 1e-14))
    assert most == pytest.approx(jet.maximum_growth_viscous_longwave(*liquid), rel=1e-11)


@given(st.floats(-4, 3), st.floats(0.01, 4.0), st.floats(1.01, 1.2))
def test_more_gas_grows_faster_in_shorter_waves(power: float, gas: float, more: float) -> None:
    little, much = reduced(10.0**power, gas), reduced(10.0**power, more * gas)
    assert jet.maximum_growth_aerodynamic(*much) > jet.maximum_growth_aerodynamic(*little)
    wave = jet.most_unstable_wavelength_aerodynamic
    assert wave(*much) < wave(*little)
    end = jet.cut_off_wavelength_aerodynamic
    assert end(*much[2:]) < end(*little[2:]) < 2.0 * math.pi


@given(st.floats(-4, 3), st.floats(1e-4, 4.9), st.floats(0.05, 0.99))
def test_growth_at_the_ends_of_the_band(power: float, gas: float, share: float) -> None:
    jet_ = reduced(10.0**power, gas)
    band = jet.growth_band_aerodynamic(*jet_, share=share)
    most = jet.maximum_growth_aerodynamic(*jet_)
    assert band.shortest < jet.most_unstable_wavelength_aerodynamic(*jet_) < band.longest
    for wave in band:
        found = growth(2.0 * math.pi / wave, 10.0**power, gas)
        assert found == pytest.approx(share * most, rel=1e-11)


@given(st.floats(1e-6, 4.9))
def test_growth_ends_at_the_cut_off(gas: float) -> None:
    end = jet.cut_off_wavelength_aerodynamic(*reduced(0.0, gas)[2:])
    x = 2.0 * math.pi / end
    assert 1.0 - x * x + 0.175 * gas * x * kv(0, x) / kv(1, x) == pytest.approx(0.0, abs=1e-13)
    assert abs(growth(x, 0.1, gas)) < 1e-12


def test_outside_its_ranges() -> None:
    with pytest.raises(OutOfRange, match="Weber number of the gas"):
        growth(0.7, 0.1, 5.1)
    with pytest.raises(OutOfRange, match="Weber number of the gas"):
        growth(0.7, 0.1, 0.21, form="weber")
    with pytest.raises(OutOfRange, match="over that of the cut-off"):
        growth(1.3, 0.1, 0.1)
    assert growth(1.3, 0.1, 0.1, outside="allow") < 0.0
    x = np.array([0.7, 1.3])
    assert np.isnan(growth(x, 0.1, 0.1, outside="nan")).tolist() == [False, True]
    with pytest.raises(UnknownName, match="sterling, weber"):
        growth(0.7, 0.1, 0.1, form="webber")
    with pytest.raises(UnknownName):
        growth(0.7, 0.1, 0.1, form=1.0)
