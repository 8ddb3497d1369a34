"""Humid air at a temperature, pressure and humidity: `air` gives an immutable `Air`."""

from __future__ import annotations

from typing import Any, Final

import numpy as np

from dropkit import units
from dropkit.errors import BadInput, Unphysical
from dropkit.properties import humid_air
from dropkit.properties.gas_state import Air
from dropkit.validity import Outside, Range, check_outside, settle

__all__ = ["Air", "air"]

TEMPERATURE: Final = Range(233.15, 473.15)
PRESSURE: Final = Range(1e4, 1e6, "pressure", "Pa")
HUMID: Final = Range(233.15, 373.15, "temperature of humid air")
# "allow" never goes below half the lowest temperature of a record.
_FLOOR: Final = 0.5 * TEMPERATURE.low

_KELVIN: Final = "A bare temperature is read in kelvin: kelvin expected; 25 degC is 298.15 K"


def air(
    temperature: Any,
    pressure: Any = 101325.0,
    humidity: Any = 0.0,
    *,
    outside: Outside = "raise",
) -> Air:
    """Air at a temperature, pressure and relative humidity.

    Holds from -40 to 200 degC and 10 kPa to 1 MPa, humid air up to 100 degC. Units in give units
    out; bare numbers and arrays are SI and give SI. Arrays broadcast.

    Parameters
    ----------
    temperature : float, array, str or Quantity
        Temperature [K].
    pressure : float, array, str or Quantity, optional
        Absolute pressure [Pa]; one standard atmosphere by default.
    humidity : float, array, str or Quantity, optional
        Relative humidity over liquid water, also below 0 degC [0..1]; dry by default. It is the
        mole fraction of water over that of saturated air at this temperature and pressure.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside the stated ranges.

    Returns
    -------
    Air
        With density, viscosity, thermal_conductivity, heat_capacity, vapour_diffusivity,
        mean_free_path, dew_point and more as attributes.

    Raises
    ------
    OutOfRange
        Outside a stated range, unless `outside` says otherwise.
    Unphysical
        A humidity that would need more water than the whole pressure.
    UnitError, BadInput
        An argument of another dimension or form, or shapes that don't broadcast.

    Examples
    --------
    >>> import dropkit as dk
    >>> room = dk.air("20 degC", humidity=0.5)
    >>> print(f"{room.density:.3f}")
    1.199 kilogram / meter ** 3
    >>> round(dk.air(293.15).viscosity * 1e6, 2)
    18.21
    """
    check_outside(outside)
    try:
        t, asked_t = units.read(temperature, "temperature", "temperature")
    except Unphysical as error:
        raise Unphysical(error.what, allowed=error.allowed, hint=_KELVIN) from None
    p, asked_p = units.read(pressure, "absolute_pressure", "pressure")
    h, asked_h = units.read(humidity, "humidity", "humidity")
    index = next((value.index for value in (t, p, h) if hasattr(value, "index")), None)
    t, p, h = (value.to_numpy() if hasattr(value, "to_numpy") else value for value in (t, p, h))
    if any(isinstance(value, np.ndarray) for value in (t, p, h)):
        try:
            t, p, h = (np.array(value) for value in np.broadcast_arrays(t, p, h))
        except ValueError:
            shapes = ", ".join(str(np.shape(value)) for value in (t, p, h))
            raise BadInput(
                f"air: the shapes of temperature, pressure and humidity do not broadcast: {shapes}",
                allowed="equal shapes, or lengths of 1 by numpy's rules",
            ) from None
    asked = next((one for one in (asked_t, asked_p, asked_h) if one and one.registry), None)
    asked = asked or asked_t or asked_p or asked_h
    bare = asked_t is None and np.any(np.less(t, 150.0))
    mask = settle("air", t, TEMPERATURE, outside, hint=_KELVIN if bare else "")
    mask = mask | settle("air", p, PRESSURE, outside)
    wet = np.where(np.greater(h, 0.0), t, HUMID.low)[()]
    mask = mask | settle(
        "air", wet, HUMID, outside, hint="Relative humidity is defined here up to 100 degC"
    )
    mask = mask | (t < _FLOOR)
    x = _water(t, p, h, mask, outside)
    return Air((t, p, x), h, asked, outside, index)


def _water(t: Any, p: Any, h: Any, mask: Any, outside: str) -> Any:
    """Mole fraction of water; NaN under the mask, Unphysical where it would pass 1."""
    # Numpy's own numbers: Python's floats would raise where these give infinity.
    kelvin, pascal = np.asarray(t)[()], np.asarray(p)[()]
    with np.errstate(all="ignore"):
        saturated = humid_air.enhancement_factor(kelvin, pascal)
        saturated = saturated * humid_air.saturation_pressure(kelvin) / pascal
        x = np.where(np.equal(h, 0.0), 0.0, h * saturated)
    x = np.where(mask | np.isnan(t) | np.isnan(p) | np.isnan(h), np.nan, x)
    too_wet = x > 1.0
    if np.any(too_wet):
        if outside != "nan":
            raise Unphysical(
                f"air: {np.count_nonzero(too_wet)} of {np.size(x)} states would hold more water "
                f"than the whole pressure (mole fraction {float(np.nanmax(x)):.3g})",
                allowed="humidity times the vapour pressure of water below the pressure",
                hint="At that temperature water boils below the given pressure; lower the humidity",
            )
        x = np.where(too_wet, np.nan, x)
    return x if isinstance(t, np.ndarray) else float(x)
