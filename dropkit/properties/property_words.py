"""The words for properties, in the order in which tables show them."""

from __future__ import annotations

from collections.abc import Iterable
from typing import Any, Final

from dropkit.errors import BadInput, UnknownName, nearest
from dropkit.record_types import LEADING

__all__ = ["GRADED", "KELVIN_HINT", "PROPERTIES", "QUOTIENT", "property_name", "property_names"]

# Every property by its word in the interface, in the order in which tables show them.
PROPERTIES: Final[dict[str, str]] = {
    "density": "mass per volume",
    "viscosity": "dynamic viscosity at low shear",
    "kinematic_viscosity": "dynamic viscosity over density",
    "surface_tension": "against air or its own vapour",
    "vapour_pressure": "absolute",
    "heat_of_vaporisation": "per mass",
    "heat_capacity": "of the liquid at constant pressure, per mass",
    "thermal_conductivity": "of the liquid",
    "static_permittivity": "relative, at low frequency",
    "speed_of_sound": "in the liquid",
    "refractive_index": "at 589 nm",
    "diffusivity_in_air": "of the vapour, at 101325 Pa",
    "electrical_conductivity": "order of magnitude: traces of water and ions decide it",
}
# The grade of a liquid is the worst of these.
GRADED: Final = LEADING
# Kinematic viscosity is the first over the second.
QUOTIENT: Final = ("viscosity", "density")

KELVIN_HINT: Final = (
    "Bare temperatures are in kelvin: kelvin expected, 25 degC is 298.15; "
    "with a unit write '25 degC'"
)


def property_name(name: str) -> str:
    """`name` if it is a property; else UnknownName with the nearest ones."""
    if isinstance(name, str) and name in PROPERTIES:
        return name
    raise UnknownName(
        f"No property is called {name!r}",
        allowed=", ".join(PROPERTIES),
        choices=nearest(str(name), PROPERTIES),
    )


def property_names(names: Any) -> list[str]:
    """A sequence of properties, each checked; one name alone is refused as a sequence."""
    if isinstance(names, str):
        raise BadInput(
            f"properties={names!r} is one name", allowed=f"a sequence, such as [{names!r}]"
        )
    if not isinstance(names, Iterable):
        raise BadInput(
            f"properties={names!r}", allowed="a sequence of names: " + ", ".join(PROPERTIES)
        )
    return [property_name(name) for name in names]
