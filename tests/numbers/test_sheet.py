"""The sheet of numbers: what it forms, from what, and how it shows and keeps itself."""

from __future__ import annotations

import json
import pickle
from types import SimpleNamespace
from typing import Any

import numpy as np
import pytest

import dropkit as dk
from dropkit import numbers
from dropkit.errors import BadInput, MissingProperty, OutOfRange, UnknownName, Unphysical
from dropkit.numbers.sheet import numbers_sheet

AIR = SimpleNamespace(
    density=1.2,
    viscosity=1.8e-5,
    mean_free_path=66e-9,
    heat_capacity=1006.0,
    thermal_conductivity=0.026,
    vapour_diffusivity=2.5e-5,
)


def ink(**more: Any) -> SimpleNamespace:
    """An invented ink."""
    base = {"name": "invented ink", "density": 1000.0, "viscosity": 0.010, "surface_tension": 0.030}
    return SimpleNamespace(**{**base, **more})


def test_values_are_those_of_the_functions() -> None:
    sheet = numbers_sheet(ink(), 25e-6, 6.0)
    assert sheet["weber"] == numbers.weber(1000.0, 0.030, 6.0, 25e-6)
    assert sheet["ohnesorge_radius"] == numbers.ohnesorge_radius(1000.0, 0.010, 0.030, 12.5e-6)
    assert sheet["capillary_length"] == numbers.capillary_length(1000.0, 0.030)
    assert "strouhal" not in sheet
    assert len(list(sheet)) == len(sheet) > 20


def test_without_a_speed_only_what_needs_none() -> None:
    sheet = numbers_sheet(ink(), 25e-6)
    assert "ohnesorge" in sheet
    assert sheet.missing["weber"] == "needs velocity"
    with pytest.raises(MissingProperty, match="needs velocity"):
        _ = sheet["weber"]
    with pytest.raises(UnknownName, match="ohnesorge"):
        _ = sheet["onesorge"]


def test_every_number_can_be_formed() -> None:
    state = ink(
        vapour_pressure=2300.0,
        heat_of_vaporisation=2.4e6,
        heat_capacity=4000.0,
        thermal_conductivity=0.5,
    )
    sheet = numbers_sheet(
        state,
        "25 um",
        "6 m/s",
        gas=AIR,
        frequency="60 kHz",
        relaxation_time="10 us",
        charge="0.1 pC",
        electric_field="1 MV/m",
        absolute_pressure="2 bar",
        flow="1 mL/min",
        pressure_drop="1 bar",
        diffusivity=1e-9,
        evaporation_constant=5e-10,
        time="1 ms",
        shear_rate=1e5,
        yield_stress=1.0,
        obstacle="1 mm",
        surface_tension_slope=-1.5e-4,
        surface_tension_difference="1 mN/m",
        temperature_difference=10.0,
        mass_transfer_coefficient=0.1,
        heat_transfer_coefficient=100.0,
        surface_mass_fraction=0.02,
        vapour_heat_capacity=1900.0,
        heat_of_fusion="330 kJ/kg",
    )
    assert sheet.missing == {}
    assert {entry.name for entry in numbers.entries()} <= set(sheet)
    assert sheet["prandtl (gas)"] == pytest.approx(0.69646, rel=1e-4)
    assert sheet["lewis (gas)"] == pytest.approx(sheet["schmidt (gas)"] / sheet["prandtl (gas)"])


def test_driven_jet_gets_its_wavelength_from_speed_and_frequency() -> None:
    sheet = numbers_sheet(ink(), "50 um", "9 m/s", frequency="40 kHz")
    assert sheet["wavelength_ratio"] == pytest.approx(4.5)
    assert any("velocity / frequency" in text for text in sheet.assumptions)
    given = numbers_sheet(ink(), "50 um", "9 m/s", frequency="40 kHz", wavelength="200 um")
    assert given["wavelength_ratio"] == pytest.approx(4.0)
    assert not any("velocity / frequency" in text for text in given.assumptions)


def test_units_in_units_out() -> None:
    bare = numbers_sheet(ink(), 25e-6, 6.0)
    assert isinstance(bare["capillary_length"], float)
    asked = numbers_sheet(ink(), "25 um", 6.0)
    assert asked["capillary_length"].to("m").magnitude == pytest.approx(bare["capillary_length"])
    assert isinstance(asked["weber"], float)
    assert asked.si()["capillary_length"] == bare["capillary_length"]
    assert str(bare.with_units()["viscous_time"].units) == "microsecond"
    units = dict(zip(asked.table().index, asked.table()["unit"], strict=True))
    assert units["capillary_length"] == "mm"


def test_quantities_in_the_state() -> None:
    import pint

    registry = pint.get_application_registry()
    state = ink(viscosity=registry.Quantity(10.0, "mPa*s"))
    sheet = numbers_sheet(state, 25e-6, 6.0)
    assert sheet["ohnesorge"] == pytest.approx(0.3651483717)


def test_arrays_broadcast_and_nan_stays_where_it_is() -> None:
    speed = np.array([[1.0], [6.0], [np.nan]])
    sheet = numbers_sheet(ink(), np.array([20e-6, 40e-6]), speed)
    assert sheet["weber"].shape == (3, 2)
    assert np.isnan(sheet["weber"][2]).all()
    assert np.isfinite(sheet["weber"][:2]).all()
    (row,) = (row for row in sheet.rows if row.key == "weber")
    leaving = row.said()[0]
    assert "too slow to leave the nozzle 2 of 6" in leaving
    assert "unknown 2 of 6" in leaving
    assert "shape (3, 2)" in repr(sheet)
    assert sheet.table().loc["weber", "value"].shape == (3, 2)


def test_a_series_is_taken_as_an_array() -> None:
    import pandas as pd

    sheet = numbers_sheet(ink(), pd.Series([20e-6, 40e-6], index=["a", "b"]))
    assert isinstance(sheet["ohnesorge"], np.ndarray)


def test_limits_are_shown_with_source_and_side() -> None:
    text = repr(numbers_sheet(ink(), 25e-6, 6.0))
    assert "drops form [1, 10 for drop-on-demand nozzles (ReisDerby2000, memory)]" in text
    assert "too viscous [4, 14 for drop-on-demand nozzles (JangKimMoon2009, abstract)]" in text
    assert "does not splash [50" in text


def test_table_has_a_row_for_each_number() -> None:
    sheet = numbers_sheet(ink(), 25e-6, 6.0)
    table = sheet.table()
    assert list(table.index) == list(sheet)
    assert table["value"].dtype == float
    assert table.loc["weber", "compares"] == "inertia of the liquid against surface tension"
    assert table.loc["weber", "scale"] == "Diameter of the jet, drop or nozzle"


@pytest.mark.parametrize("size", [25e-6, np.array([[25e-6, np.nan], [1e-5, 1e-3]])])
def test_survives_json_and_pickle(size: Any) -> None:
    sheet = numbers_sheet(ink(), size, "6 m/s", gas=AIR)
    through_json = numbers.NumbersSheet.from_dict(json.loads(json.dumps(sheet.to_dict())))
    for copy in (through_json, pickle.loads(pickle.dumps(sheet))):
        assert repr(copy) == repr(sheet)
        assert list(copy) == list(sheet)
        np.testing.assert_array_equal(copy["weber"], sheet["weber"])
        assert copy.sources == sheet.sources
        assert copy.missing == sheet.missing
    assert "NaN" not in json.dumps(sheet.to_dict())


def test_html_is_the_twin_of_the_text() -> None:
    sheet = numbers_sheet(ink(), 25e-6, 6.0)
    html = sheet._repr_html_()
    assert html.count("<tr>") == len(sheet) + 1
    assert "Z says nothing about speed" in html


def test_a_missing_property_leaves_its_numbers_out() -> None:
    class Poor:
        name = "poor"
        density = 1000.0
        viscosity = 0.001

        @property
        def surface_tension(self) -> float:
            raise MissingProperty("no surface tension is known")

        @property
        def heat_capacity(self) -> float:
            raise OutOfRange("outside")

    sheet = numbers_sheet(Poor(), 1e-4, 1.0)
    assert "reynolds" in sheet
    assert sheet.missing["weber"] == "needs surface_tension"
    assert "heat_capacity" in sheet.missing["prandtl"]


def test_a_leading_property_out_of_range_raises() -> None:
    class Cold:
        viscosity = 0.001
        surface_tension = 0.07

        @property
        def density(self) -> float:
            raise OutOfRange("outside")

    with pytest.raises(OutOfRange):
        numbers_sheet(Cold(), 1e-4, 1.0)


def test_bad_input() -> None:
    with pytest.raises(UnknownName, match="relaxation_time"):
        numbers_sheet(ink(), 1e-4, 1.0, relaxation_tme=1e-3)
    with pytest.raises(BadInput, match="property of the liquid"):
        numbers_sheet(ink(), 1e-4, 1.0, viscosity=0.1)
    with pytest.raises(UnknownName):
        numbers_sheet(ink(), 1e-4, 1.0, radius=1e-5)
    with pytest.raises(Unphysical):
        numbers_sheet(ink(), -1e-4, 1.0)
    with pytest.raises(Unphysical):
        numbers_sheet(ink(), 1e-4, -1.0)
    with pytest.raises(BadInput):
        numbers.NumbersSheet.from_dict({"kind": "State"})


@pytest.mark.parametrize(
    "gas", ["air", 1.2, dk.air, np.array([1.2])], ids=["text", "number", "function", "array"]
)
def test_a_gas_that_holds_no_properties_is_refused(gas: Any) -> None:
    with pytest.raises(BadInput, match=r"gas = .* has no density.*dk\.air\(\"25 degC\"\)"):
        dk.liquid("water").at("20 degC").numbers("60 um", "10 m/s", gas=gas)
    with pytest.raises(BadInput, match=r"state = .* has no density.*\.at\("):
        numbers_sheet(gas, "60 um")


def test_a_gas_whose_density_is_out_of_range_only_leaves_out() -> None:
    class Hot:
        viscosity = 3e-5

        @property
        def density(self) -> float:
            raise OutOfRange("outside")

    sheet = numbers_sheet(ink(), 1e-4, 1.0, gas=Hot())
    assert sheet.missing["gas_weber"] == "needs gas_density"
    assert "weber" in sheet


def test_answers_in_the_registry_of_the_first_quantity() -> None:
    import pint

    first, second = pint.UnitRegistry(), pint.UnitRegistry()
    state = ink(density=second.Quantity(1.0, "g/cm^3"))
    sheet = numbers_sheet(state, "25 um", first.Quantity(6.0, "m/s"), frequency="60 kHz")
    assert sheet["capillary_length"]._REGISTRY is first
    assert sheet.si().with_units()["capillary_length"]._REGISTRY is not first
    assert sheet.with_units()["viscous_time"]._REGISTRY is first
    by_state = numbers_sheet(state, "25 um", 6.0)
    assert by_state["capillary_length"]._REGISTRY is second
    by_text = numbers_sheet(ink(), "25 um", 6.0)
    assert by_text["capillary_length"]._REGISTRY is pint.application_registry.get()
    # A dict and a pickle hold no registry.
    assert sheet.to_dict()["with_units"] is True
    assert sheet.si().to_dict()["with_units"] is False
    for copy in (
        pickle.loads(pickle.dumps(sheet)),
        numbers.NumbersSheet.from_dict(sheet.to_dict()),
    ):
        assert copy["capillary_length"]._REGISTRY is pint.application_registry.get()
        assert copy["capillary_length"].magnitude == sheet["capillary_length"].magnitude


def test_zero_speed_leaves_out_what_divides_by_it() -> None:
    sheet = numbers_sheet(ink(), 1e-4, 0.0, frequency=1e4)
    assert sheet["weber"] == 0.0
    assert "velocity" in sheet.missing["strouhal"]


def test_a_real_liquid_brings_its_trail() -> None:
    state = dk.liquid("water").at("20 degC")
    sheet = state.numbers("60 um", "10 m/s", frequency="30 kHz")
    # Water at 20 degC from IAPWS: 998.2 kg/m3, 1.0016 mPa s, 72.74 mN/m.
    assert sheet["ohnesorge"] == pytest.approx(1.0016e-3 / (998.2 * 0.07274 * 60e-6) ** 0.5, 1e-3)
    assert {trail.quantity for trail in sheet.trails} >= {"density", "viscosity"}
    assert "dropkit" in sheet.versions
    cited = dk.cite(sheet)
    assert "IAPWS" in cited
    assert "Jang" in cited
