"""Every way of writing a value with a unit: what it means, and what is refused with which cure."""

from __future__ import annotations

import math

import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import BadInput, DropkitError, UnitError, Unphysical
from dropkit.unit_table import KINDS, kind_of
from dropkit.units import read

# Text, kind, SI value. The SI values are written out by hand from the definitions.
READ = [
    # density
    ("998.2 kg/m3", "density", 998.2),
    ("998.2 kg/m^3", "density", 998.2),
    ("998.2 kg/m**3", "density", 998.2),
    ("998.2 kg/m³", "density", 998.2),
    ("998.2 kg m-3", "density", 998.2),
    ("998.2 kg·m⁻³", "density", 998.2),
    ("1.05 g/cm3", "density", 1050.0),
    ("1.05 g/cc", "density", 1050.0),
    ("1.05 g/mL", "density", 1050.0),
    ("1.05 kg/L", "density", 1050.0),
    ("1050 g/L", "density", 1050.0),
    ("62.4 lb/ft3", "density", 62.4 * 0.45359237 / 0.3048**3),
    # dynamic viscosity
    ("4.2 mPas", "viscosity", 4.2e-3),
    ("4.2 mPa s", "viscosity", 4.2e-3),
    ("4.2 mPa·s", "viscosity", 4.2e-3),
    ("4.2 mPa.s", "viscosity", 4.2e-3),
    ("4.2 mPa*s", "viscosity", 4.2e-3),
    ("4.2 mPa * s", "viscosity", 4.2e-3),
    ("4.2 cP", "viscosity", 4.2e-3),
    ("4.2cP", "viscosity", 4.2e-3),
    ("4.2 cp", "viscosity", 4.2e-3),
    ("4.2 cps", "viscosity", 4.2e-3),
    ("4.2 cPs", "viscosity", 4.2e-3),
    ("4.2 mPa-s", "viscosity", 4.2e-3),
    ("0.042 P", "viscosity", 4.2e-3),
    ("0.0042 Pas", "viscosity", 4.2e-3),
    ("0.0042 kg/(m s)", "viscosity", 4.2e-3),
    ("0.0042 kg/m s", "viscosity", 4.2e-3),
    ("18.2 uPa*s", "gas_viscosity", 18.2e-6),
    ("18.2 µPa·s", "gas_viscosity", 18.2e-6),
    # kinematic viscosity and diffusivity
    ("4 cSt", "kinematic_viscosity", 4e-6),
    ("4 mm2/s", "kinematic_viscosity", 4e-6),
    ("4 mm²/s", "kinematic_viscosity", 4e-6),
    ("0.25 cm2/s", "diffusivity_in_air", 2.5e-5),
    # surface tension
    ("31 mN/m", "surface_tension", 0.031),
    ("31 dyn/cm", "surface_tension", 0.031),
    ("31 dynes/cm", "surface_tension", 0.031),
    ("31 mJ/m2", "surface_tension", 0.031),
    ("31 erg/cm2", "surface_tension", 0.031),
    ("-0.15 mN/(m K)", "surface_tension_slope", -1.5e-4),
    # temperature
    ("32 °C", "temperature", 305.15),
    ("32 deg C", "temperature", 305.15),
    ("32 degrees C", "temperature", 305.15),
    ("32 ° C", "temperature", 305.15),
    ("32 degC", "temperature", 305.15),
    ("32°C", "temperature", 305.15),
    ("32 ℃", "temperature", 305.15),
    ("-5 degC", "temperature", 268.15),
    ("−5 degC", "temperature", 268.15),
    ("77 degF", "temperature", 298.15),
    ("77 °F", "temperature", 298.15),
    ("298.15 K", "temperature", 298.15),
    ("491.67 degR", "temperature", 273.15),
    ("5 K", "temperature_difference", 5.0),
    ("5 delta_degC", "temperature_difference", 5.0),
    ("9 delta_degF", "temperature_difference", 5.0),
    # pressure
    ("3 bar", "pressure", 3e5),
    ("250 mbar", "pressure", 2.5e4),
    ("1 psi", "pressure", 6894.757293168361),
    ("1 PSI", "pressure", 6894.757293168361),
    ("1 PSIG", "gauge_pressure", 6894.757293168361),
    ("760 mmHg", "absolute_pressure", 760 * 133.322387415),
    ("760 mm Hg", "absolute_pressure", 760 * 133.322387415),
    ("1 inH2O", "pressure", 249.08891),
    ("1 in H2O", "pressure", 249.08891),
    ("1013.25 hPa", "absolute_pressure", 101325.0),
    ("1 atm", "absolute_pressure", 101325.0),
    ("3 barg", "gauge_pressure", 3e5),
    ("3 bar(g)", "gauge_pressure", 3e5),
    ("3 bar (g)", "gauge_pressure", 3e5),
    ("14.7 psig", "gauge_pressure", 14.7 * 6894.757293168361),
    ("3 bara", "absolute_pressure", 3e5),
    ("14.7 psia", "absolute_pressure", 14.7 * 6894.757293168361),
    ("14.7 psi(a)", "vapour_pressure", 14.7 * 6894.757293168361),
    ("3 barg", "either_pressure", 401325.0),
    ("3 bara", "either_pressure", 3e5),
    ("3 bar", "either_pressure", 3e5),
    # length
    ("60 um", "length", 60e-6),
    ("60 µm", "length", 60e-6),
    ("60 μm", "length", 60e-6),
    ("60um", "length", 60e-6),
    ("60 micron", "length", 60e-6),
    ("60 microns", "length", 60e-6),
    ("1 mil", "length", 25.4e-6),
    ("1 thou", "length", 25.4e-6),
    ("0.5 in", "length", 12.7e-3),
    ("0.5 inch", "length", 12.7e-3),
    ("6.5e-2 mm", "length", 65e-6),
    ("65e-6m", "length", 65e-6),
    ("+.065 mm", "length", 65e-6),
    ("65. um", "length", 65e-6),
    ("67 nm", "mean_free_path", 67e-9),
    ("600 dpi", "pitch", 25.4e-3 / 600),
    ("600 dpi", "resolution", 600 / 25.4e-3),
    ("3 1/mm", "wavenumber", 3e3),
    ("3 /mm", "wavenumber", 3e3),
    ("3 mm-1", "wavenumber", 3e3),
    # needle gauges: nominal bores of the chart named in the table [mm]
    ("30 G", "length", 0.159e-3),
    ("30G", "length", 0.159e-3),
    ("30 gauge", "length", 0.159e-3),
    ("30-gauge", "nozzle_diameter", 0.159e-3),
    ("25 ga", "diameter", 0.260e-3),
    ("18 G", "length", 0.838e-3),
    ("7 G", "length", 3.810e-3),
    ("31 G", "length", 0.133e-3),
    # volume, flow, mass
    ("65 pL", "volume", 65e-15),
    ("65 nL", "volume", 65e-12),
    ("65 uL", "volume", 65e-9),
    ("250 mL", "volume", 250e-6),
    ("250 ml", "volume", 250e-6),
    ("250 cc", "volume", 250e-6),
    ("2 US_gal", "volume", 7.570823568e-3),
    ("2 imp_gal", "volume", 9.09218e-3),
    ("3 mL/min", "flow", 5e-8),
    ("3 cc/min", "flow", 5e-8),
    ("3 uL/min", "flow", 5e-11),
    ("3 µL/min", "flow", 5e-11),
    ("3 L/min", "flow", 5e-5),
    ("3 L/h", "flow", 3e-3 / 3600),
    ("1 gpm", "flow", 3.785411784e-3 / 60),
    ("3 cm3/s", "flow", 3e-6),
    ("6 g/min", "mass_flow", 1e-4),
    ("36 kg/h", "mass_flow", 0.01),
    ("62 g", "mass", 0.062),
    ("0.5 t", "mass", 500.0),
    ("18.015 g/mol", "molar_mass", 0.018015),
    ("80 gsm", "grammage", 0.08),
    ("80 g/m2", "grammage", 0.08),
    # velocity, rates
    ("120 m/min", "velocity", 2.0),
    ("60 ft/min", "velocity", 0.3048),
    ("60 fpm", "velocity", 0.3048),
    ("22 m s-1", "velocity", 22.0),
    ("9.81 m/s2", "gravity", 9.81),
    ("9.81 m/s/s", "gravity", 9.81),
    ("9.81 m/s s", "gravity", 9.81),
    ("64 kHz", "frequency", 64e3),
    ("60 rpm", "frequency", 1.0),
    ("60 rev/min", "frequency", 1.0),
    ("2 rev/s", "frequency", 2.0),
    ("60 1/min", "frequency", 1.0),
    ("6.283185307179586 rad/s", "frequency", 1.0),
    ("1000 1/s", "shear_rate", 1000.0),
    ("1000 s-1", "shear_rate", 1000.0),
    ("55 us", "time", 55e-6),
    ("2 min", "time", 120.0),
    ("2 h", "time", 7200.0),
    ("1 sec", "time", 1.0),
    # heat
    ("2257 kJ/kg", "heat_of_vaporisation", 2.257e6),
    ("4.18 kJ/(kg K)", "heat_capacity", 4180.0),
    ("4.18 kJ/kg/K", "heat_capacity", 4180.0),
    ("4.18 kJ/kg K", "heat_capacity", 4180.0),
    ("4.18 J/g/degC", "heat_capacity", 4180.0),
    ("0.6 W/m/K", "thermal_conductivity", 0.6),
    ("0.6 W/m K", "thermal_conductivity", 0.6),
    ("0.6 W/m·K", "thermal_conductivity", 0.6),
    ("0.6 W/m-K", "thermal_conductivity", 0.6),
    ("0.6 W/(m·°C)", "thermal_conductivity", 0.6),
    ("600 mW/(m*K)", "thermal_conductivity", 0.6),
    ("25 W/m2K", "heat_transfer_coefficient", 25.0),
    # electricity
    ("50 uS/cm", "electrical_conductivity", 5e-3),
    ("50 µS/cm", "electrical_conductivity", 5e-3),
    ("1.2 mS/cm", "electrical_conductivity", 0.12),
    ("50 pS/m", "electrical_conductivity", 50e-12),
    ("10 kV/cm", "electric_field", 1e6),
    ("300 V", "voltage", 300.0),
    ("-0.4 pC", "charge", -0.4e-12),
    ("2 uC/g", "specific_charge", 2e-3),
    # fractions and numbers
    ("38 %", "mass_fraction", 0.38),
    ("38%", "mole_fraction", 0.38),
    ("38 wt%", "mass_fraction", 0.38),
    ("38 wt.%", "mass_fraction", 0.38),
    ("38 % w/w", "mass_fraction", 0.38),
    ("38 vol%", "volume_fraction", 0.38),
    ("38 mol%", "mole_fraction", 0.38),
    ("12 °Bx", "mass_fraction", 0.12),
    ("12 degBx", "mass_fraction", 0.12),
    ("200 ppm", "mass_fraction", 200e-6),
    ("45 %RH", "humidity", 0.45),
    ("45 %", "humidity", 0.45),
    ("0.38", "mass_fraction", 0.38),
    ("1.333", "refractive_index", 1.333),
    ("5 %", "ratio", 0.05),
    ("30 deg", "angle", math.pi / 6),
    ("30°", "angle", math.pi / 6),
    ("1 rad", "angle", 1.0),
    # words that only pint knows, alone and in products
    ("2 furlong", "distance", 2 * 660 * 1200 / 3937),  # by pint: US survey feet
    ("3 meter / second", "velocity", 3.0),
    ("3 millipascal * second", "viscosity", 3e-3),
    ("1 coulomb", "charge", 1.0),
]


@pytest.mark.parametrize(("text", "kind", "si"), READ, ids=[f"{t} {k}" for t, k, _ in READ])
def test_text_is_read(text: str, kind: str, si: float) -> None:
    value, asked = read(text, kind, "x", domain="any")
    assert type(value) is float
    assert value == pytest.approx(si, rel=1e-14, abs=0)
    assert (asked is None) == (not text.strip("0123456789.+-"))


# The trade units that dropkit promises to read or, for the last ones, to refuse.
PROMISED = (
    "kg/m3, g/cm3, g/cc, g/L, mPas, mPa s, mPa·s, cP, cps, cSt, dyn/cm, °C, deg C, degC, degF, "
    "bar, mbar, barg, bar(g), psi, psig, psia, mmHg, inH2O, mil, thou, micron, pL, nL, uL, "
    "mL/min, cc/min, uL/min, L/min, gpm, g/min, kg/h, m/min, ft/min, kHz, rpm, gsm, dpi, %, wt%, "
    "uS/cm, mS/cm, pS/m, kV/cm, °Bx, G"
)


def units_of(texts: list[str]) -> set[str]:
    """What stands behind the numbers."""
    return {text.lstrip("+-−0123456789.").strip() for text in texts}


def test_every_promised_unit_is_in_the_table_above() -> None:
    assert set(PROMISED.split(", ")) <= units_of([text for text, _, _ in READ])
    assert {"C", "F", "M", "oz", "gal"} <= units_of([text for text, _, _, _ in REFUSED])


@pytest.mark.parametrize(
    ("text", "kind", "exact"),
    [
        ("60 um", "length", 60e-6),
        ("4.2 mPa*s", "viscosity", 0.0042),
        ("31 mN/m", "surface_tension", 0.031),
        ("0.1 bar", "pressure", 1e4),
        ("25 degC", "temperature", 298.15),
        ("77 degF", "temperature", 298.15),
        ("1.1 %", "ratio", 0.011),
        ("159 um", "length", 0.000159),
    ],
)
def test_text_is_the_same_float_as_the_si_literal(text: str, kind: str, exact: float) -> None:
    assert read(text, kind, "x")[0] == exact


# --- refused ---------------------------------------------------------------------------------

# Text, kind, class, and what the message must say.
REFUSED = [
    # likely slips of dimension
    ("4 cSt", "viscosity", UnitError, ["kinematic viscosity", "Multiply it by the density"]),
    ("4 mm2/s", "gas_viscosity", UnitError, ["kinematic viscosity", "density"]),
    ("4 mPa*s", "kinematic_viscosity", UnitError, ["dynamic viscosity", "Divide it by the"]),
    ("31 mN", "surface_tension", UnitError, ["a force", "N/m or mN/m", "'1 mN/m'"]),
    ("3 mL/min", "mass_flow", UnitError, ["a volume flow", "Multiply it by the density"]),
    ("3 g/min", "flow", UnitError, ["a mass flow", "Divide it by the density"]),
    ("40.65 kJ/mol", "heat_of_vaporisation", UnitError, ["Divide it by the molar mass"]),
    ("5 %", "length", UnitError, ["pure number", "'1 um'", "bare number in m"]),
    ("600 dpi", "length", UnitError, ["dots per length", "42.33 um"]),
    ("1 cd", "length", UnitError, ["not known"]),
    # several meanings
    ("25 C", "temperature", UnitError, ["several meanings", "'degC'", "'coulomb'"]),
    ("25C", "temperature", UnitError, ["'degC'"]),
    ("1 C", "charge", UnitError, ["'coulomb'"]),
    ("77 F", "temperature", UnitError, ["'degF'", "'farad'"]),
    ("293 k", "temperature", UnitError, ["several meanings", "'K' for kelvin"]),
    ("4.18 kJ/kg/k", "heat_capacity", UnitError, ["'K' for kelvin"]),
    ("25 c", "temperature", UnitError, ["'degC'"]),
    ("77 f", "temperature", UnitError, ["'degF'"]),
    ("20 °", "temperature", UnitError, ["an angle", "write 'degC' or 'degF'"]),
    ("20 deg", "temperature", UnitError, ["an angle", "write 'degC' or 'degF'"]),
    ("5 degrees", "temperature_difference", UnitError, ["an angle", "write 'K'"]),
    ("5 cp", "volume", UnitError, ["a dynamic viscosity"]),
    ("1 M", "ratio", UnitError, ["'mol/L'"]),
    ("8 oz", "mass", UnitError, ["28.35 g", "29.57 mL"]),
    ("8 oz/min", "mass_flow", UnitError, ["28.35 g"]),
    ("1 gal", "volume", UnitError, ["'US_gal'", "'imp_gal'"]),
    ("1 gal/min", "flow", UnitError, ["'gpm'"]),
    # temperatures and differences
    ("5 degC", "temperature_difference", UnitError, ["'5 K'"]),
    ("5 delta_degC", "temperature", UnitError, ["'25 degC'"]),
    ("25 (degC)", "temperature", UnitError, ["no temperature scale"]),
    ("1 degC*1", "temperature", UnitError, ["no temperature scale"]),
    ("20 degRe", "temperature", UnitError, ["'degRe' is not known"]),
    ("30 dBm", "power", UnitError, ["'dBm' is not known"]),
    # pressures
    ("3 barg", "pressure", UnitError, ["a pressure difference", "write 'bar'"]),
    ("3 psia", "pressure", UnitError, ["write 'psi'"]),
    ("3 bara", "gauge_pressure", UnitError, ["Subtract", "101325 Pa", "'bar(g)'"]),
    ("3 bar(g)", "absolute_pressure", UnitError, ["Add", "101325 Pa", "'bar(a)'"]),
    ("3 psig", "vapour_pressure", UnitError, ["Add", "'psi(a)'"]),
    # fractions of another basis
    ("38 wt%", "mole_fraction", UnitError, ["a mole fraction", "basis"]),
    ("38 vol%", "mass_fraction", UnitError, ["basis"]),
    ("12 °Bx", "mole_fraction", UnitError, ["sucrose"]),
    ("45 %RH", "mass_fraction", UnitError, ["humidity"]),
    ("30 deg", "mass_fraction", UnitError, ["angle"]),
    ("5 %", "refractive_index", UnitError, ["plain number"]),
    ("38", "humidity", Unphysical, ["between 0 and 1", "'38 %'", "0.38"]),
    ("380 %", "mass_fraction", Unphysical, ["between 0 and 1"]),
    # rates
    ("60 rpm", "shear_rate", UnitError, ["frequency", "1/s"]),
    ("60 rad/s", "growth_rate", UnitError, ["frequency"]),
    ("60 cps", "frequency", UnitError, ["dynamic viscosity"]),
    # needle gauges
    ("33 G", "length", UnitError, ["7 to 31", "'110 um'"]),
    ("30.5 G", "length", UnitError, ["whole numbers"]),
    ("-30 G", "length", UnitError, ["whole numbers"]),
    ("30 G", "radius", UnitError, ["inner diameter"]),
    ("30 G", "density", UnitError, ["inner diameter"]),
    ("0 dpi", "pitch", Unphysical, ["no pitch"]),
    # the number
    ("1,5 um", "length", BadInput, ["comma", "'1.5 um'"]),
    (",5 um", "length", BadInput, ["'.5 um'"]),
    ("-1,5 degC", "temperature", BadInput, ["'-1.5 degC'"]),
    ("1,500 um", "length", BadInput, ["'1.500 um'", "thousands", "'1500 um'"]),
    ("1 500 um", "length", BadInput, ["two numbers", "'1000 um'"]),
    ("1_500 um", "length", BadInput, ["two numbers"]),
    ("2² m", "length", UnitError, ["cannot be read"]),
    ("um", "length", BadInput, ["does not start with a number", "'60 um'"]),
    ("", "length", BadInput, ["does not start with a number"]),
    ("nan um", "length", BadInput, ["does not start with a number"]),
    ("inf um", "length", BadInput, ["does not start with a number"]),
    ("~60 um", "length", BadInput, ["does not start with a number"]),
    ("6 0um", "length", BadInput, ["two numbers"]),
    ("٦٠ um", "length", BadInput, ["does not start with a number"]),
    ("1e400 um", "length", Unphysical, ["too large"]),
    ("1e308 km", "length", Unphysical, ["too large"]),
    ("1e-400 um", "length", Unphysical, ["must be positive"]),
    ("-60 um", "length", Unphysical, ["must be positive"]),
    ("-300 degC", "temperature", Unphysical, ["must be positive"]),
    ("60", "length", UnitError, ["no unit", "without quotes is taken in m"]),
    ("9" * 101 + " um", "length", BadInput, ["too long"]),
    # the unit
    ("60 umm", "length", UnitError, ["'umm' is not known", "Did you mean"]),
    ("4 mPaS", "viscosity", UnitError, ["'mPaS' is not known", "'mPas'"]),
    ("1.5.2 um", "length", UnitError, ["cannot be read"]),
    ("60 um um", "length", UnitError, ["an area"]),
    ("60 (um", "length", UnitError, ["bracket"]),
    ("60 um)", "length", UnitError, ["bracket"]),
    ("60 ()", "length", UnitError, ["in the wrong place"]),
    ("60 um/", "length", UnitError, ["not complete"]),
    ("60 um//s", "velocity", UnitError, ["in the wrong place"]),
    ("60 *um", "length", UnitError, ["in the wrong place"]),
    ("60 um^99", "length", UnitError, ["the power 99"]),
    ("60 um^9999999999", "length", UnitError, ["the power"]),
    ("60 um^x", "length", UnitError, ["cannot be read"]),
    ("60 µ", "length", UnitError, ["'um' for micrometres"]),
    ("60 %%", "ratio", UnitError, ["cannot be read"]),
    ("1/2 in", "length", UnitError, ["cannot be read"]),
    ("60 __import__('os')", "length", UnitError, ["cannot be read"]),
]


@pytest.mark.parametrize(
    ("text", "kind", "error", "says"), REFUSED, ids=[f"{t[:20]} {k}" for t, k, _, _ in REFUSED]
)
def test_text_is_refused_with_the_cure(
    text: str, kind: str, error: type[DropkitError], says: list[str]
) -> None:
    with pytest.raises(error) as caught:
        read(text, kind, "the_argument")
    message = str(caught.value)
    assert type(caught.value) is error
    assert message.startswith("the_argument")
    for words in says:
        assert words in message


def test_the_reading_with_the_declared_dimension_counts() -> None:
    # Strictly left to right "m/s s" is a length; as people mean it, an acceleration.
    assert read("3 m/s s", "length", "x")[0] == 3.0
    assert read("3 m/s s", "gravity", "x")[0] == 3.0
    # A star is a multiplication: no second reading.
    with pytest.raises(UnitError, match="something else"):
        read("0.6 W/m*K", "thermal_conductivity", "x")


# --- invariants --------------------------------------------------------------------------------

STOCKED = sorted(name for name, kind in KINDS.items() if kind.si)
positive = st.floats(1e-9, 1e9)


@given(name=st.sampled_from(STOCKED), value=positive)
def test_text_in_stock_units_is_the_value_times_the_factor(name: str, value: float) -> None:
    kind = kind_of(name)[0]
    si, asked = read(f"{value!r} {kind.stock}", name, "x")
    assert si == pytest.approx(value * kind.per_stock + kind.zero, rel=1e-14)
    assert asked is not None


@given(value=positive, spaces=st.text(" \t\u00a0\u2009", max_size=3))
def test_spaces_do_not_matter(value: float, spaces: str) -> None:
    text = f"{spaces}{value!r}{spaces}um{spaces}"
    assert read(text, "length", "x")[0] == read(f"{value!r} um", "length", "x")[0]


def outcome(text: str, name: str) -> float | DropkitError:
    """The SI value, or the error of ours; anything else passes through."""
    try:
        return float(read(text, name, "x")[0])
    except DropkitError as error:
        return error


def assert_clear(found: float | DropkitError) -> None:
    """A finite number, or an error that names the argument."""
    if isinstance(found, DropkitError):
        assert isinstance(found, BadInput)
        assert str(found).startswith("x")
    else:
        assert math.isfinite(found)


@given(text=st.text(max_size=40), name=st.sampled_from(sorted(KINDS)))
def test_any_text_is_a_value_or_an_error_of_ours(text: str, name: str) -> None:
    assert_clear(outcome(text, name))


NUMBERS = st.from_regex(r"[+-]?[0-9]{1,4}(\.[0-9]{0,3})?(e-?[0-9]{1,3})?", fullmatch=True)
UNITS = st.text("0123456789.,eE+-*/^() ·²°%µumkgPasNCFGKLlinbarod", max_size=16)


@given(number=NUMBERS, unit=UNITS, name=st.sampled_from(sorted(KINDS)))
def test_any_unit_is_a_value_or_an_error_of_ours(number: str, unit: str, name: str) -> None:
    assert_clear(outcome(f"{number} {unit}", name))
