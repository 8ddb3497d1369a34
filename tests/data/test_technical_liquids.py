"""Oils, siloxanes, fluorinated liquids, fuels and propellants against figures not in their fits."""

from __future__ import annotations

import warnings
from typing import Any

import numpy as np
import pytest

import dropkit as dk
from dropkit import records
from dropkit.errors import MissingProperty, OutOfRange

MAIN = ("density", "viscosity", "surface_tension")
FAMILIES = {
    "oil": (
        *("oleic_acid", "methyl_oleate", "methyl_palmitate", "triolein", "rapeseed_oil"),
        *("soybean_oil", "sunflower_oil", "olive_oil", "castor_oil", "dibutyl_phthalate"),
        "diethylhexyl_sebacate",
    ),
    "siloxane": (
        *("hexamethyldisiloxane", "octamethyltrisiloxane", "decamethyltetrasiloxane"),
        *("dodecamethylpentasiloxane", "octamethylcyclotetrasiloxane"),
        "decamethylcyclopentasiloxane",
        *(f"polydimethylsiloxane_{grade}" for grade in (5, 10, 20, 50, 100, 350, 500, 1000)),
    ),
    "fluorinated": (
        *("perfluorohexane", "perfluoromethylcyclohexane", "perfluorodecalin", "perfluorooctane"),
        *("perfluorotributylamine", "methoxyperfluorobutane", "ethoxyperfluorobutane"),
    ),
    "fuel": ("diesel", "jet_fuel", "gasoline"),
    "propellant": (
        *("hfa-134a", "hfa-227ea", "hfa-152a", "hfo-1234ze", "propane", "n-butane"),
        *("isobutane", "dimethyl_ether"),
    ),
    "acrylate": ("hexanediol_diacrylate", "isobornyl_acrylate"),
}
TECHNICAL = (
    *("rapeseed_oil", "soybean_oil", "sunflower_oil", "olive_oil", "castor_oil", "diesel"),
    *("jet_fuel", "gasoline", "polydimethylsiloxane_5", "polydimethylsiloxane_1000"),
    *("perfluorotributylamine", "ethoxyperfluorobutane", "methoxyperfluorobutane"),
)

# Density kg/m3, viscosity mPa s (or kinematic viscosity mm2/s), surface tension mN/m, each with
# the band within which the figure must be met, and its source.
FIGURES = [
    # Demirbas 1998 and Bhattacharyya 1994 in the tables of a site on vegetable oils: seen, in no
    # record; 38 to 40 degC, natural oils differ by 10 %.
    ("soybean_oil", "kinematic_viscosity", 311.15, 33.1e-6, 0.12),
    ("sunflower_oil", "kinematic_viscosity", 311.15, 34.4e-6, 0.10),
    ("rapeseed_oil", "kinematic_viscosity", 311.15, 37.3e-6, 0.12),
    ("rapeseed_oil", "kinematic_viscosity", 313.15, 39e-6, 0.12),
    # A textbook's table of liquids at 25 degC (CRC handbooks, copied in a teaching page): seen.
    ("propane", "density", 298.15, 494.0, 0.005),
    ("jet_fuel", "density", 298.15, 821.0, 0.044),
    ("jet_fuel", "viscosity", 298.15, 1.64e-3, 0.38),
    # Oil database, jet fuel A / A-1, record AD02193: reference folder, second source of density.
    ("jet_fuel", "density", 288.15, 816.0, 0.03),
    # Constants of a coolants table in a public web program: seen, in no record.
    ("perfluorohexane", "density", 298.15, 1680.0, 0.005),
    ("perfluorohexane", "viscosity", 298.15, 0.64e-3, 0.06),
    ("ethoxyperfluorobutane", "density", 298.15, 1420.0, 0.005),
    # A study of bouncing drops prints 949 kg/m3 and 20.6 mN/m for this grade: seen.
    ("polydimethylsiloxane_20", "surface_tension", 298.15, 20.6e-3, 0.07),
    # What follows is from memory: the grades of silicone fluids, and handbook values.
    ("hexamethyldisiloxane", "kinematic_viscosity", 298.15, 0.65e-6, 0.05),
    ("octamethyltrisiloxane", "kinematic_viscosity", 298.15, 1.0e-6, 0.05),
    ("decamethyltetrasiloxane", "kinematic_viscosity", 298.15, 1.5e-6, 0.06),
    ("dodecamethylpentasiloxane", "kinematic_viscosity", 298.15, 2.0e-6, 0.05),
    ("polydimethylsiloxane_5", "surface_tension", 298.15, 19.7e-3, 0.10),
    ("polydimethylsiloxane_50", "surface_tension", 298.15, 20.8e-3, 0.06),
    ("polydimethylsiloxane_1000", "density", 298.15, 971.0, 0.006),
    ("squalane", "viscosity", 298.15, 28.3e-3, 0.05),
    ("squalane", "density", 298.15, 804.5, 0.003),
    ("methyl_oleate", "density", 288.15, 877.4, 0.002),
    ("hfa-134a", "density", 298.15, 1206.0, 0.003),
    ("dimethyl_ether", "vapour_pressure", 298.15, 593e3, 0.02),
    ("n-butane", "vapour_pressure", 272.65, 101325.0, 0.01),
]


def quiet(key: str) -> Any:
    """A liquid; what rests on memory warns, and is not what these tests are about."""
    return dk.liquid(key)


def value(key: str, quantity: str, kelvin: float) -> float:
    with warnings.catch_warnings():
        warnings.simplefilter("ignore")
        return float(getattr(quiet(key), quantity)(kelvin))


@pytest.mark.parametrize(("key", "quantity", "kelvin", "figure", "band"), FIGURES)
def test_figures_that_no_fit_used(
    key: str, quantity: str, kelvin: float, figure: float, band: float
) -> None:
    assert value(key, quantity, kelvin) == pytest.approx(figure, rel=band)


@pytest.mark.parametrize("family", FAMILIES)
def test_every_liquid_of_a_family_is_complete(family: str) -> None:
    for key in FAMILIES[family]:
        record = records.liquid_record(key)
        assert record.family == family, key
        assert set(MAIN) <= set(record.properties), key


@pytest.mark.parametrize("key", TECHNICAL)
def test_a_technical_liquid_says_so_and_is_no_better_than_it_is(key: str) -> None:
    record = records.liquid_record(key)
    assert any("technical" in text for text in record.cautions), key
    assert record.properties["density"][0].grade != "reference"
    if record.family == "fuel":
        assert any("ranged" in text for text in record.cautions)
        for name in MAIN:
            assert record.properties[name][0].uncertainty >= 0.012, (key, name)


@pytest.mark.parametrize("key", FAMILIES["propellant"])
def test_a_propellant_is_a_liquid_under_its_own_pressure(key: str) -> None:
    record = records.liquid_record(key)
    assert record.boiling_point is not None
    assert record.boiling_point < 273.15
    state = quiet(key).at("25 degC")
    told = " ".join(state.cautions)
    assert "flash boiling" in told
    assert "needs p >=" in told
    assert value(key, "vapour_pressure", 298.15) > 2e5


@pytest.mark.parametrize("key", [key for family in FAMILIES.values() for key in family])
def test_warmer_is_thinner_lighter_and_of_less_tension(key: str) -> None:
    record = records.liquid_record(key)
    for name in MAIN:
        span = record.properties[name][0].range
        grid = np.linspace(span.low, span.high, 9)
        values = [value(key, name, float(T)) for T in grid]
        assert np.all(np.diff(values) < 0.0), (key, name)
        assert min(values) > 0.0


def test_grades_of_silicone_oils_are_their_kinematic_viscosity_at_25_degc() -> None:
    for grade in (5, 10, 20, 50, 100, 350, 500, 1000):
        nu = value(f"polydimethylsiloxane_{grade}", "kinematic_viscosity", 298.15)
        assert nu == pytest.approx(grade * 1e-6, rel=0.01)


def test_memory_stays_graded_as_memory() -> None:
    for key, name in (
        ("diethylhexyl_sebacate", "viscosity"),
        ("oleic_acid", "viscosity"),
        ("castor_oil", "surface_tension"),
        ("perfluorodecalin", "viscosity"),
        ("gasoline", "viscosity"),
    ):
        block = records.liquid_record(key).properties[name][0]
        assert (block.grade, block.uncertainty >= 0.05) == ("recalled", True), (key, name)


# --- faults of copies and engines that must not reach a user ---------------------------------
def test_the_hydrofluoroether_is_not_given_its_kinematic_viscosity_for_the_dynamic_one() -> None:
    # CoolProp 8.0.0, INCOMP::HFE2 at 25 degC: 0.372 mPa s; the maker's 0.58 (seen in a program).
    assert value("methoxyperfluorobutane", "viscosity", 298.15) == pytest.approx(0.58e-3, rel=0.08)


def test_the_tetramer_has_its_own_density_at_25_degc() -> None:
    # CRC copy: 853.6 under the label 25 degC, which is the value of 20 degC.
    assert value("decamethyltetrasiloxane", "density", 293.15) == pytest.approx(853.6, rel=2e-4)
    assert value("decamethyltetrasiloxane", "density", 298.15) == pytest.approx(848.6, rel=2e-4)


def test_the_surface_tension_of_hfa_227ea_is_the_measured_one() -> None:
    # Int. J. Thermophys. 27 (2006) 1609: 7.46 mN/m at 20 degC; CoolProp 8.0.0 has 7.61.
    assert value("hfa-227ea", "surface_tension", 293.15) == pytest.approx(7.46e-3, rel=0.005)


def test_triacetin_has_no_vapour_pressure_a_thousand_times_too_high() -> None:
    # chemicals 1.5.2, Landolt-Boernstein row: 150 Pa at 20 degC.
    with pytest.raises(MissingProperty):
        quiet("triacetin").vapour_pressure(293.15)


def test_squalane_keeps_to_the_collected_tables() -> None:
    # Automated measurements of a public data set: 23.44 mPa s at 25 degC, excluded.
    assert value("squalane", "viscosity", 298.15) > 26e-3


def test_dimethyl_ether_is_not_read_from_handbooks_that_end_at_its_boiling_point() -> None:
    assert records.liquid_record("dimethyl_ether").properties["viscosity"][0].sources == (
        "Meng2012",
    )


def test_ranges_are_kept() -> None:
    with pytest.raises(OutOfRange):
        quiet("perfluorotributylamine").viscosity(360.0)
    with pytest.raises(OutOfRange):
        quiet("propane").density(360.0)


def test_trade_names_find_their_liquids() -> None:
    for name, key in (
        ("silicone oil 50 cSt", "polydimethylsiloxane_50"),
        ("D5", "decamethylcyclopentasiloxane"),
        ("HMDSO", "hexamethyldisiloxane"),
        ("canola oil", "rapeseed_oil"),
        ("DEHS", "diethylhexyl_sebacate"),
        ("HFC-134a", "hfa-134a"),
        ("Jet A-1", "jet_fuel"),
        ("petrol", "gasoline"),
        ("FC-72 (isomers)", "perfluorohexane"),
    ):
        assert dk.liquid(name).name == records.liquid_record(key).name
