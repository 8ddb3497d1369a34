"""The equations of humid air against other formulations, engines, and values from outside.

CoolProp's humid air (ASHRAE RP-1485, Herrmann et al. 2009) and dry air (Lemmon et al. 2000) are other
equations than those used here, except where a test says so.
"""

from __future__ import annotations

import math

import CoolProp.CoolProp as CP
import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.properties import humid_air

R = 8.314462618


# --- saturation ------------------------------------------------------------------------------
@pytest.mark.parametrize("temperature", np.linspace(273.16, 373.12, 12))
def test_saturation_pressure_against_iapws(temperature: float) -> None:
    # IAPWS-95 as CoolProp evaluates it; Hardy's equation is another fit. Worst 6e-5.
    expected = CP.PropsSI("P", "T", temperature, "Q", 0, "Water")
    assert humid_air.saturation_pressure(temperature) == pytest.approx(expected, rel=8e-5)


def test_saturation_pressure_of_supercooled_water() -> None:
    # Sonntag's equation for liquid water, coefficients as a public program gives them:
    # ln p = -6096.9385/T + 21.2409642 - 2.711193e-2 T + 1.673952e-5 T^2 + 2.433502 ln T
    t = np.linspace(233.15, 273.15, 9)
    sonntag = np.exp(
        -6096.9385 / t + 21.2409642 - 2.711193e-2 * t + 1.673952e-5 * t**2 + 2.433502 * np.log(t)
    )
    np.testing.assert_allclose(humid_air.saturation_pressure(t), sonntag, rtol=6e-3)
    np.testing.assert_allclose(humid_air.saturation_pressure(t[-3:]), sonntag[-3:], rtol=5e-4)


@pytest.mark.parametrize(("pressure", "tolerance"), [(101325.0, 3e-4), (5e5, 7e-4), (1e6, 1.2e-3)])
def test_enhancement_factor(pressure: float, tolerance: float) -> None:
    for temperature in (274.0, 293.15, 313.15, 333.15, 353.15, 368.15):
        saturated = CP.HAPropsSI("Y", "T", temperature, "P", pressure, "R", 1.0)
        expected = saturated * pressure / CP.PropsSI("P", "T", temperature, "Q", 0, "Water")
        found = humid_air.enhancement_factor(temperature, pressure)
        assert found == pytest.approx(expected, rel=tolerance)
    assert humid_air.enhancement_factor(373.15, 5e4) == 1.0  # boiling: no air left
    # The two sets of coefficients meet at 0 degC.
    step = humid_air.enhancement_factor(273.15, pressure) / humid_air.enhancement_factor(
        math.nextafter(273.15, 0.0), pressure
    )
    assert step == pytest.approx(1.0, abs=1e-4)


@given(st.floats(233.15, 373.15), st.floats(1e-4, 1.0))
def test_dew_point_is_the_inverse(temperature: float, humidity: float) -> None:
    pressure = 101325.0 if temperature < 370.0 else 2e5
    vapour = (
        humidity
        * humid_air.enhancement_factor(temperature, pressure)
        * humid_air.saturation_pressure(temperature)
    )
    dew = humid_air.dew_point(vapour, pressure)
    if math.isnan(dew):
        assert vapour < 5e-3
        return
    assert dew <= temperature + 1e-3
    back = humid_air.enhancement_factor(dew, pressure) * humid_air.saturation_pressure(dew)
    assert back == pytest.approx(vapour, rel=1e-9)


@pytest.mark.parametrize(("temperature", "humidity"), [(293.15, 0.5), (313.15, 0.2), (353.15, 0.9)])
def test_dew_point_against_an_engine(temperature: float, humidity: float) -> None:
    expected = CP.HAPropsSI("D", "T", temperature, "P", 101325.0, "R", humidity)
    vapour = (
        humidity
        * humid_air.enhancement_factor(temperature, 101325.0)
        * humid_air.saturation_pressure(temperature)
    )
    assert humid_air.dew_point(vapour, 101325.0) == pytest.approx(expected, abs=5e-3)


# --- density and heat capacity -----------------------------------------------------------------
@pytest.mark.parametrize(
    ("temperature", "cubic_centimetres"),
    [(173.15, -55.94), (273.15, -13.15), (373.15, 3.72), (473.15, 12.31)],
)
def test_second_virial_of_dry_air(temperature: float, cubic_centimetres: float) -> None:
    # Hyland & Wexler 1983, Table 1, as a public test quotes it.
    small = 1e-3  # Pa: the slope of Z at zero pressure
    slope = (humid_air.compressibility(temperature, 1e3 * small, 0.0) - 1.0) / (1e3 * small)
    assert slope * R * temperature * 1e6 == pytest.approx(cubic_centimetres, abs=0.01)


def cipm_2007(temperature: float, pressure: float, humidity: float) -> float:
    """Density of moist air by CIPM-2007 (Picard et al. 2008), as six public programs give it."""
    t = temperature - 273.15
    saturated = math.exp(
        1.2378847e-5 * temperature**2
        - 1.9121316e-2 * temperature
        + 33.93711047
        - 6.3431645e3 / temperature
    )
    factor = 1.00062 + 3.14e-8 * pressure + 5.6e-7 * t * t
    x = humidity * factor * saturated / pressure
    z = (
        1.0
        - pressure
        / temperature
        * (
            1.58123e-6
            - 2.9331e-8 * t
            + 1.1043e-10 * t * t
            + (5.707e-6 - 2.051e-8 * t) * x
            + (1.9898e-4 - 2.376e-6 * t) * x * x
        )
        + (pressure / temperature) ** 2 * (1.83e-11 - 0.765e-8 * x * x)
    )
    air, water = 28.96546e-3, 18.01528e-3
    return pressure * air / (z * 8.314472 * temperature) * (1.0 - x * (1.0 - water / air))


@given(st.floats(288.15, 300.15), st.floats(6e4, 1.1e5), st.floats(0.0, 1.0))
def test_density_against_cipm_2007(temperature: float, pressure: float, humidity: float) -> None:
    # The metrologists' formula in its whole stated range, with its own vapour pressure.
    vapour = humid_air.enhancement_factor(temperature, pressure) * humid_air.saturation_pressure(
        temperature
    )
    found = humid_air.gas_density(temperature, pressure, humidity * vapour / pressure)
    assert found == pytest.approx(cipm_2007(temperature, pressure, humidity), rel=4e-5)


GRID = [
    (t, p, h)
    for t in (233.15, 253.15, 273.16, 293.15, 323.15, 353.15, 368.15, 423.15, 473.15)
    for p in (1e4, 101325.0, 1e6)
    for h in (0.0, 0.5, 1.0)
    if h == 0.0 or (273.15 < t < 373.15 and h * humid_air.saturation_pressure(t) < 0.85 * p)
]


@pytest.mark.parametrize(("temperature", "pressure", "humidity"), GRID)
def test_density_and_heat_capacity_against_rp_1485(
    temperature: float, pressure: float, humidity: float
) -> None:
    vapour = humid_air.enhancement_factor(temperature, pressure) * humid_air.saturation_pressure(
        temperature
    )
    x = humidity * vapour / pressure
    state = ("T", temperature, "P", pressure, "Y", max(x, 1e-12))
    density = 1.0 / CP.HAPropsSI("Vha", *state)
    assert humid_air.gas_density(temperature, pressure, x) == pytest.approx(
        density, rel=2e-4 + 2e-4 * x
    )
    capacity = CP.HAPropsSI("Cha", *state)
    assert humid_air.gas_heat_capacity(temperature, pressure, x) == pytest.approx(
        capacity,
        rel=1e-3 + 1.2e-2 * x,  # near boiling the vapour's third coefficient is missed
    )


@pytest.mark.parametrize("temperature", [233.15, 273.15, 293.15, 373.15, 473.15])
def test_dry_density_against_the_reference_equation(temperature: float) -> None:
    for pressure, tolerance in ((1e4, 1e-5), (101325.0, 2e-5), (1e6, 1.5e-4)):
        expected = CP.PropsSI("D", "T", temperature, "P", pressure, "Air")
        found = humid_air.gas_density(temperature, pressure, 0.0)
        assert found == pytest.approx(expected, rel=tolerance)


# --- transport -----------------------------------------------------------------------------------
def test_dry_viscosity_and_conductivity_published_cases() -> None:
    # Examples of another program of Lemmon & Jacobsen's equations: 300 K, 1 bar; 300 K, 40 mol/m3.
    viscosity = humid_air.gas_viscosity(300.0, 1e5, 0.0)
    assert viscosity == pytest.approx(1.85371518556e-05, rel=1e-6)
    conductivity = humid_air.gas_thermal_conductivity(300.0, 40.0 * R * 300.0, 0.0)
    assert conductivity == pytest.approx(0.0263839695044, rel=1e-6)


@pytest.mark.parametrize("temperature", [233.15, 293.15, 373.15, 473.15])
def test_dry_transport_with_all_terms(temperature: float) -> None:
    # The same equations with every density term: what leaving the small ones out costs.
    for pressure in (1e4, 101325.0, 1e6):
        state = ("T", temperature, "P", pressure, "Air")
        viscosity, conductivity = CP.PropsSI("V", *state), CP.PropsSI("L", *state)
        assert humid_air.gas_viscosity(temperature, pressure, 0.0) == pytest.approx(
            viscosity, rel=2e-4
        )
        assert humid_air.gas_thermal_conductivity(temperature, pressure, 0.0) == pytest.approx(
            conductivity, rel=4e-4
        )


def test_dry_viscosity_against_sutherlands_law() -> None:
    # The form used with Kim's slip correction in public programs: 18.1809 uPa s at 293.15 K.
    # Lemmon & Jacobsen state 1 %.
    for t in (273.15, 293.15, 313.15, 373.15):
        sutherland = 1.81809e-5 * (t / 293.15) ** 1.5 * (293.15 + 110.4) / (t + 110.4)
        assert humid_air.gas_viscosity(t, 101325.0, 0.0) == pytest.approx(sutherland, rel=6e-3)


@pytest.mark.parametrize("temperature", [283.15, 313.15, 353.15, 373.15])
def test_pure_vapour_end(temperature: float) -> None:
    # IAPWS R12-08 and R15-11 for the saturated vapour; here at zero density, 0.9 % off at 100 degC.
    pressure = CP.PropsSI("P", "T", temperature, "Q", 1, "Water")
    viscosity = CP.PropsSI("V", "T", temperature, "Q", 1, "Water")
    conductivity = CP.PropsSI("L", "T", temperature, "Q", 1, "Water")
    assert humid_air.gas_viscosity(temperature, pressure, 1.0) == pytest.approx(viscosity, rel=9e-3)
    assert humid_air.gas_thermal_conductivity(temperature, pressure, 1.0) == pytest.approx(
        conductivity, rel=0.02
    )


@given(st.floats(280.0, 373.0), st.floats(0.0, 1.0))
def test_mixing_stays_near_its_ends(temperature: float, x: float) -> None:
    pressure = 101325.0
    for function in (humid_air.gas_viscosity, humid_air.gas_thermal_conductivity):
        air, vapour = function(temperature, pressure, 0.0), function(temperature, pressure, 1.0)
        mixed = function(temperature, pressure, x)
        assert min(air, vapour) * (1 - 1e-12) <= mixed <= max(air, vapour) * 1.02


@pytest.mark.parametrize(
    ("temperature", "expected", "tolerance"),
    [
        # Welty, Wicks & Wilson 1984 as an appendix prints it: D p = 2.634 m2 Pa/s at 298 K
        (298.0, 2.600e-5, 0.03),
        # Fuller's method, computed from published diffusion volumes; an estimate
        (298.15, 2.503e-5, 0.03),
        # Marrero & Mason 1972, 0.209 cm2/s (T/273.15)^2.072, as a public program gives it
        (283.15, 0.209e-4 * (283.15 / 273.15) ** 2.072, 0.05),
        (373.15, 0.209e-4 * (373.15 / 273.15) ** 2.072, 0.05),
    ],
)
def test_diffusivity(temperature: float, expected: float, tolerance: float) -> None:
    found = humid_air.water_diffusivity(temperature, 101325.0)
    assert found == pytest.approx(expected, rel=tolerance)


def test_mean_free_path() -> None:
    at = humid_air.gas_mean_free_path(296.15, 101325.0, 0.0)
    assert at == pytest.approx(67.30e-9, rel=1e-12)  # Kim et al. 2005
    # 0.066 um at 20 degC, from a table of an aerosol handbook
    assert humid_air.gas_mean_free_path(293.15, 101325.0, 0.0) == pytest.approx(0.066e-6, rel=0.01)
    # 0.0651 um at 298 K in another textbook: another convention, and a rounded viscosity
    assert humid_air.gas_mean_free_path(298.0, 101325.0, 0.0) == pytest.approx(0.0651e-6, rel=0.05)
    # Scaled as the programs with Kim's value do it: (T/T0)^2 (T0 + 110.4)/(T + 110.4)
    for t in (263.15, 313.15, 373.15):
        scaled = 67.30e-9 * (t / 296.15) ** 2 * (296.15 + 110.4) / (t + 110.4)
        assert humid_air.gas_mean_free_path(t, 101325.0, 0.0) == pytest.approx(scaled, rel=4e-3)
