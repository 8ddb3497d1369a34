"""`numbers_sheet`: every number that a liquid at one condition and a size allow, in one table."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any, Final

from dropkit import units
from dropkit.errors import (
    BadInput,
    DropkitError,
    MissingProperty,
    OutOfRange,
    UnknownName,
    Unphysical,
    nearest,
)
from dropkit.numbers.catalogue import Entry, entries
from dropkit.numbers.sheet_rows import NumberRow, NumbersSheet
from dropkit.provenance import Trail
from dropkit.unit_errors import shown

__all__ = ["numbers_sheet"]

# Words that the liquid's state answers, and those that a gas answers under another name.
_LIQUID: Final = (
    "density",
    "viscosity",
    "surface_tension",
    "vapour_pressure",
    "heat_of_vaporisation",
    "heat_capacity",
    "thermal_conductivity",
)
_LEADING: Final = _LIQUID[:3]
_SURROUNDINGS: Final = {
    "gas_density": "density",
    "gas_viscosity": "viscosity",
    "mean_free_path": "mean_free_path",
}
# Numbers of these words alone are properties of a fluid: they are formed for the gas as well.
_OF_A_GAS: Final = {
    "density": "density",
    "viscosity": "viscosity",
    "heat_capacity": "heat_capacity",
    "thermal_conductivity": "thermal_conductivity",
    "diffusivity": "vapour_diffusivity",
}
_DERIVED: Final = ("length", "radius", "velocity")


def numbers_sheet(
    state: Any,
    length: Any,
    velocity: Any = None,
    *,
    gas: Any = None,
    frequency: Any = None,
    wavelength: Any = None,
    relaxation_time: Any = None,
    charge: Any = None,
    electric_field: Any = None,
    gravity: Any = None,
    **more: Any,
) -> NumbersSheet:
    """Every number that can be formed from a liquid at one condition, a size, and what else is known.

    Parameters
    ----------
    state : State
        The liquid at one condition, or any object with the attributes ``density``, ``viscosity``,
        ``surface_tension`` and perhaps others; each a float, array or Quantity.
    length : float, array or with a unit
        Diameter of the jet, drop or nozzle [m].
    velocity : float, array or with a unit, optional
        Speed of the liquid, relative to the gas where there is one [m/s].
    gas : optional
        The gas around it: an object with ``density``, ``viscosity``, ``mean_free_path`` and so on.
    frequency : float, array or with a unit, optional
        Frequency of a vibration; with `velocity` it gives the wavelength [Hz].
    wavelength : float, array or with a unit, optional
        Wavelength on the jet [m].
    relaxation_time : float, array or with a unit, optional
        Relaxation time of the liquid [s].
    charge : float, array or with a unit, optional
        Charge of the drop [C].
    electric_field : float, array or with a unit, optional
        Electric field [V/m].
    gravity : float, array or with a unit, optional
        Acceleration of gravity, 9.80665 unless given [m/s2].
    **more
        Any other argument that a number takes, by its name: ``shear_rate``, ``yield_stress``,
        ``diffusivity``, ``evaporation_constant``, ``obstacle``, ``time``, ``gas_density`` ...

    Returns
    -------
    NumbersSheet
        The numbers with what each compares and the limits that the trade quotes.

    Raises
    ------
    UnknownName
        For a name in `more` that no number takes.
    BadInput
        For input that cannot be read, a state or gas that is only a name, or a property of the
        liquid given beside it.
    OutOfRange
        If density, viscosity or surface tension are asked for outside their range.

    Notes
    -----
    ``radius`` is half of `length`. A property that the liquid lacks, or another one outside its
    range, leaves the numbers that need it out; ``sheet.missing`` names them. If anything carries
    a unit, the sheet answers with units, in the registry of the first Quantity: of the arguments
    in their order, else of the properties.

    Examples
    --------
    >>> from types import SimpleNamespace
    >>> ink = SimpleNamespace(density=1000.0, viscosity=0.010, surface_tension=0.030)
    >>> sheet = numbers_sheet(ink, "25 um", "6 m/s")
    >>> round(sheet["ohnesorge"], 4), sheet.missing["strouhal"]
    (0.3651, 'needs frequency')
    """
    options = {
        "frequency": frequency,
        "wavelength": wavelength,
        "relaxation_time": relaxation_time,
        "charge": charge,
        "electric_field": electric_field,
        "gravity": gravity,
        **more,
    }
    known = _Known(state, gas, length, velocity, options)
    rows: list[NumberRow] = []
    missing: dict[str, str] = {}
    for entry in entries():
        _form(entry, "liquid", known.find, rows, missing)
        if gas is not None and set(entry.arguments) <= set(_OF_A_GAS):
            _form(entry, "gas", known.find_gas, rows, missing)
    rows.sort(key=lambda row: row.kind != "ratio")  # lengths, times and speeds go last
    return NumbersSheet(
        str(getattr(state, "name", "liquid")),
        tuple(rows),
        missing,
        tuple(known.trails.values()),
        tuple(known.assumptions),
        tuple(getattr(state, "cautions", ())),
        known.versions(),
        known.asked,
    )


def _form(
    entry: Entry,
    fluid: str,
    find: Callable[[str], Any],
    rows: list[NumberRow],
    missing: dict[str, str],
) -> None:
    """Add a row, or what the number lacks."""
    function = entry.function
    key = entry.name if fluid == "liquid" else f"{entry.name} (gas)"
    found = {word: find(word) for word in entry.arguments}
    lacking = [
        word for word, value in found.items() if value is None and word not in entry.optional
    ]
    if lacking:
        missing[key] = f"needs {', '.join(lacking)}"
        return
    try:
        value = function(**{word: v for word, v in found.items() if v is not None})
    except Unphysical as reason:
        missing[key] = str(reason)
        return
    scale = entry.scale
    rows.append(
        NumberRow(
            entry.name,
            entry.symbol,
            fluid,
            value,
            entry.returns,
            entry.compares,
            scale,
            entry.limits,
        )
    )


class _Known:
    """What is known: given, of the liquid, of the gas, or derived; in SI."""

    def __init__(
        self, state: Any, gas: Any, length: Any, velocity: Any, options: dict[str, Any]
    ) -> None:
        _check_holder("state", state, 'dk.liquid("water").at("20 degC")')
        if gas is not None:
            _check_holder("gas", gas, 'dk.air("25 degC")')
        self._state, self._gas = state, gas
        self._given: dict[str, Any] = {}
        self._fluid: dict[tuple[str, str], Any] = {}
        self.asked: units.Asked | None = None
        self.trails: dict[tuple[str, str], Trail] = {}
        self.assumptions: dict[str, None] = dict.fromkeys(
            ("one diameter for nozzle, jet and drop: the length given; the radius is half of it",)
        )
        self._kinds = {
            word: kind for entry in entries() for word, kind in entry.function.kinds.items()
        }
        self.read("length", length)
        if velocity is not None:
            self.read("velocity", velocity, domain=">= 0")
        for word, value in options.items():
            if word in _LIQUID:
                raise BadInput(
                    f"{word} is a property of the liquid and cannot be given beside it",
                    hint="with_values() of a liquid or mixture puts in what was measured",
                )
            if word not in self._kinds or word in _DERIVED:
                choices = [name for name in self._kinds if name not in (*_LIQUID, *_DERIVED)]
                raise UnknownName(
                    f"no number takes {word!r}",
                    choices=nearest(word, choices),
                    hint="The arguments of all numbers stand in dropkit.numbers.overview()",
                )
            if value is not None:
                self.read(word, value)

    def read(self, word: str, value: Any, **options: Any) -> None:
        """Take up a value that was given."""
        si, asked = units.read(value, self._kinds[word], word, **options)
        si = si.to_numpy() if hasattr(si, "to_numpy") else si  # a Series would bring its index
        self._note(asked)
        self._given[word] = si

    def _note(self, asked: units.Asked | None) -> None:
        """Keep how the first argument with a unit was asked, and the first registry."""
        if asked is not None and (self.asked is None or self.asked.registry is None):
            self.asked = asked

    def versions(self) -> dict[str, str]:
        """Versions of dropkit and of what the properties rest on."""
        from dropkit.properties.trails import versions

        found = versions()
        for trail in self.trails.values():
            found.update(trail.versions)
        return found

    def find(self, word: str) -> Any:
        """The SI value of an argument of a number of the liquid, or None."""
        if word in self._given:
            return self._given[word]
        if word == "radius":
            return 0.5 * self._given["length"]
        if word in _LIQUID:
            return self._property("liquid", word, word)
        if word in _SURROUNDINGS:
            return self._property("gas", _SURROUNDINGS[word], word)
        if word == "wavelength":
            return self._wavelength()
        if word == "thermal_diffusivity":
            conductivity, density, capacity = map(
                self.find, ("thermal_conductivity", "density", "heat_capacity")
            )
            if conductivity is None or density is None or capacity is None:
                return None
            return conductivity / (density * capacity)
        return None

    def find_gas(self, word: str) -> Any:
        """The SI value of a property of the gas, or None."""
        return self._property("gas", _OF_A_GAS[word], word)

    def _wavelength(self) -> Any:
        speed, frequency = self._given.get("velocity"), self._given.get("frequency")
        if speed is None or frequency is None:
            return None
        self.assumptions["wavelength = velocity / frequency: the jet moves at one speed"] = None
        return speed / frequency

    def _property(self, fluid: str, name: str, word: str) -> Any:
        if (fluid, name) in self._fluid:
            return self._fluid[fluid, name]
        holder = self._state if fluid == "liquid" else self._gas
        value = None
        try:
            value = getattr(holder, name, None)
        except MissingProperty:
            pass
        except OutOfRange:
            if fluid == "liquid" and name in _LEADING:
                raise
        if value is not None:
            value, asked = units.read(value, self._kinds[word], word)
            self._note(asked)
            trail = getattr(holder, "trail", None)
            if callable(trail):
                self.trails[fluid, name] = trail(name)
        self._fluid[fluid, name] = value
        return value


def _check_holder(word: str, holder: Any, example: str) -> None:
    """Refuse what holds no properties, such as a name: it would be passed over in silence."""
    try:
        if hasattr(holder, "density"):
            return
    except DropkitError:
        return  # it has the property, if no value here
    raise BadInput(
        f"{word} = {shown(holder)} has no density",
        allowed="an object with density, viscosity and so on",
        hint=f"Pass {example}",
    )
