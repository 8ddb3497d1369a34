"""Chemicals without a record, by CAS number: the same interface, grade and trail; and refusals.

Reference figures carry their source. "ThermoML" is the NIST/TRC ThermoML archive, with the DOI.
"""

from __future__ import annotations

import json
import pickle
import subprocess
import sys

import numpy as np
import pandas as pd
import pytest
from hypothesis import given
from hypothesis import strategies as st

import dropkit as dk
from dropkit import records
from dropkit.errors import (
    BadInput,
    CompositionError,
    DropkitError,
    DropkitWarning,
    EstimateRefused,
    EstimateWarning,
    MissingProperty,
    OutOfRange,
    RangeWarning,
    UnknownName,
)
from dropkit.properties.engines import engine_curve, engine_liquid, engine_properties
from dropkit.properties.engines.coolprop_adapter import COOLPROP_LETTERS
from dropkit.properties.engines.handbook_tables import identity_of
from dropkit.properties.engines.thermo_adapter import METHODS
from dropkit.properties.other_chemicals import FROM_ENGINES, awake, key_of
from dropkit.properties.property_words import PROPERTIES
from dropkit.properties.pure import Liquid
from dropkit.properties.state import State


def unrecorded(*numbers: str) -> str:
    """The first CAS number that no record holds: a record may be added for some of them."""
    return next(cas for cas in numbers if cas not in records.index())


# One that handbooks have and CoolProp has not, one that both have, one that mixes with water.
HANDBOOK = unrecorded("108-86-1", "462-06-6", "110-02-1")  # bromobenzene, fluorobenzene, thiophene
COOLPROP = unrecorded("287-92-3", "115-07-1", "109-66-0")  # cyclopentane, propene, pentane
WET = unrecorded("107-12-0", "110-91-8", "107-10-8")  # propionitrile, morpholine, propylamine
NOBODY = "999999-99-4"  # a right check digit, and no chemical
ESTIMATES_ONLY = unrecorded("77-93-0", "5131-66-8", "88917-22-0")


# ------------------------------------------------ values
@pytest.mark.parametrize(
    ("prop", "temperature", "value", "source"),
    [
        ("density", 293.15, 1137.1, "CRC Handbook, as in the data files of chemicals 1.5.2"),
        ("viscosity", 298.15, 0.629e-3, "equations of Perry 2008 and VDI 2010, 0.1 % apart"),
        ("surface_tension", 303.0, 35.47e-3, "second copy of the table of Jasper 1972"),
        ("static_permittivity", 293.2, 37.27, "CRC Handbook, the value beside the polynomial"),
    ],
)
def test_nitromethane_against_published_values(prop, temperature, value, source):
    # Made by the engines, whatever record there may be.
    fluid = Liquid(engine_liquid("75-52-5"))
    band = 2 * fluid.uncertainty(prop, temperature)
    assert getattr(fluid, prop)(temperature) == pytest.approx(value, rel=band), source


@pytest.mark.parametrize("cas", [HANDBOOK, COOLPROP, WET])
def test_the_interface_is_that_of_a_liquid(cas):
    fluid = dk.liquid(cas)
    assert fluid.cas == fluid.key == cas
    assert fluid.available() == tuple(
        prop
        for prop in PROPERTIES
        if prop in engine_properties(cas) or prop == "kinematic_viscosity"
    )
    for prop in fluid.available():
        limits = fluid.range(prop)
        kelvin = np.linspace(limits.low, limits.high, 5)
        look = getattr(fluid, prop)
        singles = [look(float(t)) for t in kelvin]
        assert all(type(value) is float for value in singles)
        np.testing.assert_allclose(look(kelvin), singles, rtol=1e-13)
        assert look(kelvin.reshape(5, 1)).shape == (5, 1)
        series = look(pd.Series(kelvin, index=list("abcde")))
        assert list(series.index) == list("abcde")
        celsius = look((float(kelvin[2]) - 273.15, "degC"))
        bare = celsius.to_base_units().magnitude if hasattr(celsius, "magnitude") else celsius
        assert bare == pytest.approx(singles[2], rel=1e-9)
        trail = fluid.trail(prop)
        assert trail.grade in ("single", "estimated")
        assert trail.uncertainty > 0.0
        assert trail.sources
        assert set(trail.versions) > {"dropkit", "data"}
        if prop != "kinematic_viscosity":
            curve = engine_curve(cas, prop)
            assert singles[2] == curve.scalar(float(kelvin[2]))
            assert trail.records[0].record == curve.label
            assert f"method {curve.method} of {curve.engine} {curve.version}" in trail.method
            assert trail.versions[curve.engine] == curve.version
    assert fluid.grade() in ("single", "estimated")
    assert all(key in dk.cite(fluid) for key in fluid.sources)


def test_what_is_known_of_it():
    fluid = dk.liquid("108-86-1")
    assert (fluid.name, fluid.formula) == ("bromobenzene", "C6H5Br")
    # Atomic masses of C, H and Br, IUPAC: 12.011, 1.008, 79.904.
    assert fluid.molar_mass == pytest.approx(157.01e-3, abs=0.01e-3)
    assert fluid.boiling_point == pytest.approx(429.2, abs=0.5)  # [from memory] 156 degC
    assert fluid.melting_point == pytest.approx(242.4, abs=0.5)  # [from memory] -31 degC
    assert fluid.flash_point is None
    assert any("follow the safety data sheet" in text for text in fluid.cautions)
    assert "from CoolProp and handbook tables" in repr(fluid)
    assert "bromobenzene" in fluid._repr_html_()
    assert dk.liquid(" 108\u201386\u20111 ") == fluid  # pasted dashes
    assert identity_of("999999-99-4") is None
    # Deuterium stands in no file of identifiers: CoolProp tells its mass.
    assert dk.liquid("7782-39-0").molar_mass == pytest.approx(4.028e-3, abs=1e-6)


def test_phases_are_told_at_the_temperature():
    fluid = dk.liquid("287-92-3")
    warm = fluid.trail("density", fluid.boiling_point + 20.0)
    assert any(text.startswith("needs p >= ") for text in warm.cautions)
    room = fluid.trail("density", 293.15)
    assert not any("needs p" in text for text in room.cautions)
    bromobenzene = dk.liquid("108-86-1")
    cold = bromobenzene.trail("static_permittivity", bromobenzene.melting_point - 5.0)
    assert any("supercooled" in text for text in cold.cautions)


# ------------------------------------------------ range
def test_nothing_is_extrapolated_whatever_is_asked():
    fluid = dk.liquid(HANDBOOK)
    low = fluid.range("viscosity").low - 10.0
    inside = fluid.range("viscosity").low + 10.0
    with pytest.raises(OutOfRange):
        fluid.viscosity(low)
    assert np.isnan(fluid.viscosity(low, outside="nan"))
    with pytest.warns(DropkitWarning, match="engines are not extrapolated"):
        assert np.isnan(fluid.viscosity(low, outside="allow"))
    with pytest.warns(RangeWarning), pytest.warns(DropkitWarning, match="not extrapolated; 1"):
        found = fluid.kinematic_viscosity(np.array([low, inside, np.nan]), outside="warn")
    assert np.isnan(found).tolist() == [True, False, True]


# ------------------------------------------------ travelling
def test_states_survive_json_and_pickles_a_process_that_imported_nothing(tmp_path):
    fluid = dk.liquid(HANDBOOK)
    state = fluid.at("25 degC")
    assert State.from_dict(json.loads(json.dumps(state.to_dict()))) == state
    assert state.table().loc["viscosity", "grade"] == fluid.grade("viscosity")
    mixed = dk.mixture({HANDBOOK: 0.4, "toluene": "rest"}, by="mass", estimates="allow")
    assert pickle.loads(pickle.dumps(fluid)) == fluid
    path = tmp_path / "fluids.pickle"
    more = dk.liquid("toluene", engines=True)
    path.write_bytes(pickle.dumps([fluid, mixed, state.si(), more]))
    code = (
        f"import pickle; fluid, mixed, state, more = pickle.load(open({str(path)!r}, 'rb'))\n"
        "print([fluid.density(300.0), mixed.density(300.0), state.density, more.density(300.0)])"
    )
    run = subprocess.run([sys.executable, "-c", code], capture_output=True, text=True, check=False)
    expected = [fluid.density(300.0), mixed.density(300.0), state.si().density, more.density(300.0)]
    assert run.stdout.strip() == repr(expected), run.stderr


# ------------------------------------------------ what fails
def test_a_wrong_check_digit_names_the_right_number():
    wrong = HANDBOOK[:-1] + str((int(HANDBOOK[-1]) + 1) % 10)
    for ask in (dk.liquid, key_of, lambda cas: dk.mixture({cas: 1.0}, by="mass")):
        with pytest.raises(BadInput, match=f"its last digit does not check.*{HANDBOOK}"):
            ask(wrong)


def test_a_number_that_nobody_knows():
    with pytest.raises(UnknownName, match="neither dropkit's records nor CoolProp nor thermo"):
        dk.liquid(NOBODY)


def test_a_chemical_of_which_thermo_has_only_estimates():
    with pytest.raises(UnknownName, match="estimates are not used") as caught:
        dk.liquid(ESTIMATES_ONLY)
    assert identity_of(ESTIMATES_ONLY).name in str(caught.value)


def test_names_stay_with_the_records_and_the_error_tells_of_cas_numbers():
    for name in ("propionitrile", "bromobenzene", "CycloPentane"):
        with pytest.raises(UnknownName, match="by its CAS number") as caught:
            dk.liquid(name)
        assert "seconds" in caught.value.hint


@given(st.text(alphabet="0123456789- ", max_size=14))
def test_arbitrary_numbers_give_a_key_or_an_error_of_dropkits(text):
    try:
        key = key_of(text)
    except DropkitError:
        return
    assert records.liquid_record(key).key == key


def test_a_missing_property_says_what_the_engines_lack_or_left_out():
    fluid = dk.liquid(HANDBOOK)
    with pytest.raises(MissingProperty, match="no whitelisted method of CoolProp or thermo"):
        fluid.refractive_index(298.15)
    # Ethylcyclohexane's vapour pressure in one table is ethylbenzene's; another table serves.
    # Tributyl phosphate: its one surface tension line is a copying slip.
    phosphate = dk.liquid(unrecorded("126-73-8"))
    with pytest.raises(MissingProperty, match="second copy of Jasper's table"):
        phosphate.surface_tension(298.15)
    with pytest.raises(MissingProperty, match="with_values"):
        phosphate.at(298.15).surface_tension  # noqa: B018
    assert "second copy" in repr(phosphate)
    # p-cresol: two methods contradict each other.
    with pytest.raises(MissingProperty, match="contradicted"):
        dk.liquid(unrecorded("106-44-5")).kinematic_viscosity(340.0)


@pytest.mark.parametrize("engines", [None, 1, "yes"])
def test_engines_is_true_or_false(engines):
    with pytest.raises(BadInput, match="True or False"):
        dk.liquid("water", engines=engines)


# ------------------------------------------------ what records lack
def test_the_words_that_engines_know():
    assert set(FROM_ENGINES) == {m.quantity for m in METHODS} | set(COOLPROP_LETTERS)


@pytest.mark.parametrize(
    "key", [k for k, e in records.summaries().items() if e["kind"] == "liquid"]
)
def test_records_are_neither_replaced_nor_extended(key):
    own, more = dk.liquid(key), dk.liquid(key, engines=True)
    for prop in own.available():
        assert more.range(prop) == own.range(prop)
        assert more.trail(prop).records == own.trail(prop).records
    added = set(more.available()) - set(own.available()) - {"kinematic_viscosity"}
    assert added <= set(FROM_ENGINES)
    for prop in added:
        assert more.trail(prop).grade in ("single", "estimated")
        assert more.trail(prop).records[0].record.startswith(("CoolProp: ", "thermo: "))
    assert pickle.loads(pickle.dumps(more)) == more


def test_a_record_lacks_something_until_the_engines_are_asked(made_up):
    lean = dk.liquid("lean")
    assert lean.available() == ("density",)
    with pytest.raises(MissingProperty, match="engines=True"):
        lean.viscosity(300.0)
    with pytest.raises(MissingProperty) as caught:
        lean.refractive_index(300.0)
    assert "engines" not in str(caught.value)
    more = dk.liquid("lean", engines=True)
    assert more.viscosity(298.15) == engine_curve("287-92-3", "viscosity").scalar(298.15)
    assert more.trail("viscosity").grade == "single"
    # Its own density stays, though the engine's is another.
    assert (
        more.density(298.15)
        == lean.density(298.15)
        != engine_curve("287-92-3", "density").scalar(298.15)
    )
    assert "what the record lacks" in repr(more)
    with pytest.raises(MissingProperty, match="no whitelisted method"):
        more.refractive_index(300.0)


@pytest.fixture
def made_up(monkeypatch):
    """A store with one liquid of a CAS number that CoolProp knows, and of its density alone."""
    from dataclasses import replace

    from dropkit.record_types import Table

    water = records.liquid_record("water")
    block = water.properties["density"][0]
    lean = replace(
        water,
        key="lean",
        name="lean",
        cas="287-92-3",
        properties=Table({"density": (block,)}),
        facts=Table({}),
    )
    records.adopt(lean)
    real = records.index()
    monkeypatch.setattr(records, "index", lambda: {**real, "lean": "lean"})
    monkeypatch.setattr("dropkit.properties.catalogue.index", lambda: {**real, "lean": "lean"})
    yield
    records._store()._liquids.pop("lean")


# ------------------------------------------------ mixtures and tables
def test_a_mixture_with_a_recorded_liquid_is_an_estimate():
    with pytest.warns(EstimateWarning, match="pairs without measured records"):
        mixed = dk.mixture({HANDBOOK: 0.3, "toluene": "rest"}, by="mass")
    assert mixed.grade("viscosity") == "estimated"
    first, last = dk.liquid(HANDBOOK).viscosity(300.0), dk.liquid("toluene").viscosity(300.0)
    assert min(first, last) < mixed.viscosity(300.0) < max(first, last)
    trail = mixed.trail("density")
    assert any("one phase taken for granted" in text for text in trail.assumptions)
    assert {"thermo", "CoolProp"} & set(trail.versions)
    shares = mixed.fractions("mole")
    assert sum(shares.values()) == pytest.approx(1.0)
    with pytest.raises(EstimateRefused):
        dk.mixture(
            {dk.liquid(HANDBOOK): 0.3, "toluene": "rest"}, by="mass", estimates="refuse"
        ).viscosity(300.0)
    found = mixed.find(density=mixed.density(300.0), at=300.0, vary=HANDBOOK)
    assert found.values == pytest.approx([0.3], rel=1e-6)


def test_one_of_it_alone_is_the_liquid():
    alone = dk.mixture({HANDBOOK: 1.0}, by="mass")
    assert alone.density(300.0) == dk.liquid(HANDBOOK).density(300.0)


def test_with_water():
    # Nothing says whether it gathers at the surface: no surface tension.
    with pytest.warns(EstimateWarning, match="Refused: surface_tension"):
        wet = dk.mixture({WET: 0.05, "water": "rest"}, by="mass")
    assert wet.grade("density") == "estimated"
    with pytest.raises(EstimateRefused, match="not estimated"):
        wet.surface_tension(298.15)
    # Hydrocarbons and halogenated ones make two liquids; without carbon nothing is known.
    for cas, other, why in (
        (COOLPROP, "water", "hardly dissolves"),
        (HANDBOOK, "water", "hardly dissolves"),
        (unrecorded("7726-95-6", "10025-78-2"), "ethanol", "nothing says"),
    ):
        with pytest.raises(CompositionError, match=why):
            dk.mixture({cas: 0.1, other: "rest"}, by="mass")


def test_compare_and_lookup_take_cas_numbers():
    table = dk.compare(HANDBOOK, "water", at="25 degC", properties=["density", "refractive_index"])
    column = table[dk.liquid(HANDBOOK).name]
    assert list(column["grade"]) == [dk.liquid(HANDBOOK).grade("density"), "missing"]
    wrong = HANDBOOK[:-1] + str((int(HANDBOOK[-1]) + 1) % 10)
    frame = pd.DataFrame(
        {"liquid": [HANDBOOK, "water", NOBODY, wrong], "temperature [degC]": [20.0] * 4}
    )
    found = dk.lookup(frame)
    assert found["density [kg/m3]"][0] == pytest.approx(dk.liquid(HANDBOOK).density(293.15))
    assert list(found["grade"])[2:] == ["", ""]
    assert "neither" in found["reason"][2]
    assert HANDBOOK in found["reason"][3]
    columns = pd.DataFrame({f"{HANDBOOK} [wt%]": [20.0], "temperature": [300.0]})
    mixed = dk.lookup(columns, ["density"], rest="toluene")
    assert mixed["grade"][0] == "estimated"
    with pytest.raises(UnknownName, match="no component that is known"):
        dk.lookup(columns.rename(columns={f"{HANDBOOK} [wt%]": f"{wrong} [wt%]"}), rest="toluene")
    table = dk.grid({HANDBOOK: [0.1, 0.2], "toluene": "rest"}, [300.0], ["density"], by="mass")
    assert table["density [kg/m3]"].notna().all()


def test_pictures_and_own_values():
    import matplotlib as mpl

    mpl.use("Agg")
    ax = dk.plots.property_over_temperature(HANDBOOK, property="viscosity")
    assert ax.get_xlabel() == "temperature [degC]"
    mpl.pyplot.close("all")
    own = dk.liquid(HANDBOOK).with_values(surface_tension="36 mN/m", at="20 degC")
    assert own.surface_tension(293.15) == pytest.approx(36e-3)
    assert own.grade("surface_tension") == "single"  # it leans on the engine's trend


# ------------------------------------------------ cost and notice
COLD = """
import logging, sys, threading, warnings
warnings.simplefilter("error")
import dropkit as dk
dk.liquid("water").density(300.0)
try:
    dk.liquid("glicerol")
except dk.errors.UnknownName:
    pass
try:
    dk.liquid("water").trail("nonsense")
except dk.errors.UnknownName:
    pass
lazy = [name for name in sys.modules if name.startswith(("CoolProp", "dropkit.properties.engines"))]
assert not lazy, lazy
lines = []
class Keep(logging.Handler):
    def emit(self, record):
        lines.append((record.name, record.levelname, record.getMessage()))
logging.getLogger("dropkit").addHandler(Keep())
found, start = [None] * 16, threading.Barrier(16)
def ask(number):
    start.wait()
    fluid = dk.liquid(("CAS1", "CAS2")[number % 2])
    found[number] = fluid.density(300.0)
threads = [threading.Thread(target=ask, args=(number,)) for number in range(16)]
for thread in threads: thread.start()
for thread in threads: thread.join()
assert all(found[n] == found[n % 2] is not None for n in range(16)), found
assert len(lines) == 1, lines
print(lines[0])
"""


def test_the_first_use_says_once_that_it_takes_seconds_and_names_cost_nothing():
    code = COLD.replace("CAS1", HANDBOOK).replace("CAS2", COOLPROP)
    run = subprocess.run(
        [sys.executable, "-W", "error", "-c", code], capture_output=True, text=True, check=False
    )
    assert run.returncode == 0, run.stderr
    assert run.stdout.startswith("('dropkit', 'WARNING', ")
    assert "seconds" in run.stdout


def test_keys_of_pickles():
    assert awake("water") == "water"
    assert awake("7732-18-5") == "water"  # a record of its own since then
    assert awake(HANDBOOK) == HANDBOOK
