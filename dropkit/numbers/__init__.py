"""Dimensionless numbers and the scales behind them, grouped by the forces they compare.

The length scale stands in the name or the docstring of each: ``length`` is the diameter of a jet,
drop or nozzle; forms on the radius are functions of their own with an argument ``radius``.
`overview` lists them all, `numbers_sheet` forms all that a liquid and a size allow.
"""

from __future__ import annotations

import importlib
from typing import TYPE_CHECKING, Any, Final

if TYPE_CHECKING:
    from dropkit.numbers.capillarity import gas_weber as gas_weber
    from dropkit.numbers.capillarity import gas_weber_radius as gas_weber_radius
    from dropkit.numbers.capillarity import weber as weber
    from dropkit.numbers.capillarity import weber_radius as weber_radius
    from dropkit.numbers.catalogue import Entry as Entry
    from dropkit.numbers.catalogue import entries as entries
    from dropkit.numbers.catalogue import overview as overview
    from dropkit.numbers.diffusion import fourier as fourier
    from dropkit.numbers.diffusion import fourier_mass as fourier_mass
    from dropkit.numbers.diffusion import lewis as lewis
    from dropkit.numbers.diffusion import peclet as peclet
    from dropkit.numbers.diffusion import peclet_evaporation as peclet_evaporation
    from dropkit.numbers.diffusion import peclet_heat as peclet_heat
    from dropkit.numbers.diffusion import prandtl as prandtl
    from dropkit.numbers.diffusion import schmidt as schmidt
    from dropkit.numbers.elasticity import bingham as bingham
    from dropkit.numbers.elasticity import deborah as deborah
    from dropkit.numbers.elasticity import elastocapillary as elastocapillary
    from dropkit.numbers.elasticity import weissenberg as weissenberg
    from dropkit.numbers.electric import electric_bond as electric_bond
    from dropkit.numbers.electric import electric_bond_radius as electric_bond_radius
    from dropkit.numbers.electric import fissility as fissility
    from dropkit.numbers.electric import rayleigh_charge_ratio as rayleigh_charge_ratio
    from dropkit.numbers.electric import taylor_field_ratio as taylor_field_ratio
    from dropkit.numbers.gravity import archimedes as archimedes
    from dropkit.numbers.gravity import bond as bond
    from dropkit.numbers.gravity import bond_radius as bond_radius
    from dropkit.numbers.gravity import bond_root as bond_root
    from dropkit.numbers.gravity import galilei as galilei
    from dropkit.numbers.gravity import morton as morton
    from dropkit.numbers.impact import splash_parameter as splash_parameter
    from dropkit.numbers.inertia import cavitation_number as cavitation_number
    from dropkit.numbers.inertia import discharge_coefficient as discharge_coefficient
    from dropkit.numbers.inertia import froude as froude
    from dropkit.numbers.inertia import gas_reynolds as gas_reynolds
    from dropkit.numbers.inertia import reynolds as reynolds
    from dropkit.numbers.inertia import reynolds_radius as reynolds_radius
    from dropkit.numbers.inertia import strouhal as strouhal
    from dropkit.numbers.limits import Limit as Limit
    from dropkit.numbers.limits import limits_of as limits_of
    from dropkit.numbers.particles import knudsen as knudsen
    from dropkit.numbers.particles import stokes as stokes
    from dropkit.numbers.scale_lengths import capillary_length as capillary_length
    from dropkit.numbers.scale_lengths import inertio_capillary_length as inertio_capillary_length
    from dropkit.numbers.scale_lengths import (
        inertio_capillary_velocity as inertio_capillary_velocity,
    )
    from dropkit.numbers.scale_lengths import (
        inertio_capillary_velocity_radius as inertio_capillary_velocity_radius,
    )
    from dropkit.numbers.scale_lengths import visco_capillary_length as visco_capillary_length
    from dropkit.numbers.scale_lengths import visco_capillary_velocity as visco_capillary_velocity
    from dropkit.numbers.scale_lengths import viscous_length as viscous_length
    from dropkit.numbers.scale_times import capillary_time as capillary_time
    from dropkit.numbers.scale_times import inertio_capillary_time as inertio_capillary_time
    from dropkit.numbers.scale_times import (
        inertio_capillary_time_radius as inertio_capillary_time_radius,
    )
    from dropkit.numbers.scale_times import visco_capillary_time as visco_capillary_time
    from dropkit.numbers.scale_times import (
        visco_capillary_time_radius as visco_capillary_time_radius,
    )
    from dropkit.numbers.scale_times import viscous_time as viscous_time
    from dropkit.numbers.scale_times import viscous_time_radius as viscous_time_radius
    from dropkit.numbers.sheet import numbers_sheet as numbers_sheet
    from dropkit.numbers.sheet_rows import NumbersSheet as NumbersSheet
    from dropkit.numbers.surface_gradients import marangoni as marangoni
    from dropkit.numbers.surface_gradients import marangoni_mass as marangoni_mass
    from dropkit.numbers.transfer import biot as biot
    from dropkit.numbers.transfer import jakob as jakob
    from dropkit.numbers.transfer import nusselt as nusselt
    from dropkit.numbers.transfer import sherwood as sherwood
    from dropkit.numbers.transfer import spalding_heat as spalding_heat
    from dropkit.numbers.transfer import spalding_mass as spalding_mass
    from dropkit.numbers.transfer import stefan as stefan
    from dropkit.numbers.viscocapillarity import capillary as capillary
    from dropkit.numbers.viscocapillarity import laplace as laplace
    from dropkit.numbers.viscocapillarity import laplace_radius as laplace_radius
    from dropkit.numbers.viscocapillarity import ohnesorge as ohnesorge
    from dropkit.numbers.viscocapillarity import ohnesorge_radius as ohnesorge_radius
    from dropkit.numbers.viscocapillarity import z_number as z_number
    from dropkit.numbers.waves import reduced_wavenumber as reduced_wavenumber
    from dropkit.numbers.waves import wavelength_ratio as wavelength_ratio

# File -> the public names in it; a test compares them with what the files hold.
_THEMES: Final[dict[str, tuple[str, ...]]] = {
    "capillarity": (
        "gas_weber",
        "gas_weber_radius",
        "weber",
        "weber_radius",
    ),
    "catalogue": (
        "Entry",
        "entries",
        "overview",
    ),
    "diffusion": (
        "fourier",
        "fourier_mass",
        "lewis",
        "peclet",
        "peclet_evaporation",
        "peclet_heat",
        "prandtl",
        "schmidt",
    ),
    "elasticity": (
        "bingham",
        "deborah",
        "elastocapillary",
        "weissenberg",
    ),
    "electric": (
        "electric_bond",
        "electric_bond_radius",
        "fissility",
        "rayleigh_charge_ratio",
        "taylor_field_ratio",
    ),
    "gravity": (
        "archimedes",
        "bond",
        "bond_radius",
        "bond_root",
        "galilei",
        "morton",
    ),
    "impact": ("splash_parameter",),
    "inertia": (
        "cavitation_number",
        "discharge_coefficient",
        "froude",
        "gas_reynolds",
        "reynolds",
        "reynolds_radius",
        "strouhal",
    ),
    "limits": (
        "Limit",
        "limits_of",
    ),
    "particles": (
        "knudsen",
        "stokes",
    ),
    "scale_lengths": (
        "capillary_length",
        "inertio_capillary_length",
        "inertio_capillary_velocity",
        "inertio_capillary_velocity_radius",
        "visco_capillary_length",
        "visco_capillary_velocity",
        "viscous_length",
    ),
    "scale_times": (
        "capillary_time",
        "inertio_capillary_time",
        "inertio_capillary_time_radius",
        "visco_capillary_time",
        "visco_capillary_time_radius",
        "viscous_time",
        "viscous_time_radius",
    ),
    "sheet": ("numbers_sheet",),
    "sheet_rows": ("NumbersSheet",),
    "surface_gradients": (
        "marangoni",
        "marangoni_mass",
    ),
    "transfer": (
        "biot",
        "jakob",
        "nusselt",
        "sherwood",
        "spalding_heat",
        "spalding_mass",
        "stefan",
    ),
    "viscocapillarity": (
        "capillary",
        "laplace",
        "laplace_radius",
        "ohnesorge",
        "ohnesorge_radius",
        "z_number",
    ),
    "waves": (
        "reduced_wavenumber",
        "wavelength_ratio",
    ),
}
_HOMES: Final[dict[str, str | None]] = {
    name: f"dropkit.numbers.{theme}" for theme, names in _THEMES.items() for name in names
}

__all__ = sorted(_HOMES)


def __getattr__(name: str) -> Any:
    home = _HOMES.get(name)
    if home is None:
        raise AttributeError(f"module 'dropkit.numbers' has no attribute {name!r}")
    value = getattr(importlib.import_module(home), name)
    globals()[name] = value
    return value


def __dir__() -> list[str]:
    return sorted({*globals(), *__all__})
