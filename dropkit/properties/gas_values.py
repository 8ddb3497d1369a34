"""The values of the properties of air at a condition: in SI, with NaN for what cannot be."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.errors import DropkitWarning, MissingProperty, warn_user
from dropkit.properties import humid_air
from dropkit.validity import Outside, Range, settle

__all__ = ["Point", "gas_value"]

DIFFUSING: Final = Range(273.15, 373.15)


class Point(NamedTuple):
    """The condition of a gas, in SI.

    Parameters
    ----------
    temperature, pressure, x : float or ndarray
        Temperature [K], pressure [Pa], mole fraction of water.
    """

    temperature: Any
    pressure: Any
    x: Any


_COMPUTE: Final[dict[str, Callable[[Point], Any]]] = {
    "density": lambda at: humid_air.gas_density(*at),
    "viscosity": lambda at: humid_air.gas_viscosity(*at),
    "kinematic_viscosity": lambda at: humid_air.gas_viscosity(*at) / humid_air.gas_density(*at),
    "thermal_conductivity": lambda at: humid_air.gas_thermal_conductivity(*at),
    "heat_capacity": lambda at: humid_air.gas_heat_capacity(*at),
    "vapour_diffusivity": lambda at: humid_air.water_diffusivity(at.temperature, at.pressure),
    "mean_free_path": lambda at: humid_air.gas_mean_free_path(*at),
    "molar_mass": lambda at: (1.0 - at.x) * humid_air.DRY_AIR + at.x * humid_air.WATER,
    "saturation_vapour_pressure": lambda at: humid_air.saturation_pressure(at.temperature),
    "water_mole_fraction": lambda at: at.x,
    "vapour_pressure": lambda at: at.x * at.pressure,
    "dew_point": lambda at: humid_air.dew_point(at.x * at.pressure, at.pressure),
}
# Zero is an answer of these, not a failure.
_MAY_VANISH: Final = frozenset({"water_mole_fraction", "vapour_pressure"})


def gas_value(prop: str, at: Point, outside: Outside) -> Any:
    """One property of air [SI].

    Parameters
    ----------
    prop : str
        A key of `STATEMENTS`.
    at : Point
        The condition.
    outside : {"raise", "warn", "nan", "allow"}
        The range policy.

    Returns
    -------
    float or ndarray
        In the shape of the condition.

    Raises
    ------
    MissingProperty
        For the dew point of dry air.
    OutOfRange
        For the diffusivity beyond its range, where the policy says so.
    """
    scalar = not isinstance(at.temperature, np.ndarray)
    known: Any = np.isfinite(at.x)
    mask: Any = False
    if prop == "vapour_diffusivity":
        mask = settle(f"air: {prop}", at.temperature, DIFFUSING, outside)
    if prop == "dew_point":
        known = known & np.greater(at.x, 0.0)
        if scalar and at.x == 0.0:
            raise MissingProperty(
                "dry air has no dew point", hint="Give a humidity above zero to dropkit.air"
            )
    # Numpy's own numbers: Python's floats would raise where these give infinity.
    exact = Point(*(np.asarray(value)[()] for value in at))
    with np.errstate(all="ignore"):
        value = np.asarray(_COMPUTE[prop](exact), dtype=np.float64)
    good = np.isfinite(value) & (value >= 0.0 if prop in _MAY_VANISH else value > 0.0)
    lost = int(np.count_nonzero(~good & known & ~np.asarray(mask)))
    if lost:
        warn_user(
            f"air: {prop}: {lost} value(s) had no finite positive result and became NaN",
            DropkitWarning,
        )
    value = np.where(good & known & ~np.asarray(mask), value, np.nan)
    return float(value) if scalar else value
