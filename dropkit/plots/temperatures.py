"""A property against temperature, with the published points and the uncertainty band."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

import numpy as np

from dropkit import units
from dropkit.errors import BadInput
from dropkit.plots.axes import axes_or_new, label, markers
from dropkit.properties import display
from dropkit.properties.interface import Fluid
from dropkit.properties.points import pure_points
from dropkit.properties.property_words import property_name
from dropkit.properties.pure import Liquid, liquid

if TYPE_CHECKING:
    from matplotlib.axes import Axes

__all__ = ["property_over_temperature"]


def property_over_temperature(
    *fluids: Any,
    property: str,
    between: tuple[Any, Any] | None = None,
    points: bool = True,
    band: bool = True,
    ax: Any = None,
) -> Axes:
    """Draw a property against temperature for one or more fluids.

    Parameters
    ----------
    *fluids : str or Fluid
        Names of liquids, or liquids, mixtures and users' fluids with one composition.
    property : str
        Such as ``"viscosity"``.
    between : pair of temperatures, optional
        Ends [K, or with a unit]; by default the stated range.
    points : bool
        Show the published points of pure liquids.
    band : bool
        Shade the 95 % band.
    ax : matplotlib Axes, optional
        Where to draw; a new one by default.

    Returns
    -------
    matplotlib.axes.Axes
        In degC and the trade's unit.

    Raises
    ------
    BadInput
        Nothing to draw, or an array of compositions.
    MissingProperty
        A fluid lacks the property.

    Examples
    --------
    >>> import dropkit as dk
    >>> ax = dk.plots.property_over_temperature("water", property="viscosity")
    >>> ax.get_xlabel()
    'temperature [degC]'
    """
    property_name(property)
    if not fluids:
        raise BadInput("Nothing to draw", allowed="names of liquids, or fluids")
    items = [item if isinstance(item, Fluid) else liquid(item) for item in fluids]
    axes = axes_or_new(ax)
    for number, item in enumerate(items):
        if item._shape() != ():
            raise BadInput(f"{item.name} has an array of compositions", allowed="one composition")
        limits = item.range(property)
        low, high = limits.low, limits.high
        if between is not None:
            low, high = _ends(between)
        if not np.isfinite(high):
            low, high = 273.15, 373.15
        kelvin = np.linspace(low, high, 301)
        found = item._evaluate(property, kelvin, "nan")
        if not np.isfinite(found).any():
            item._evaluate(property, kelvin, "raise")  # says what the range is
        values = display.in_stock(property, found)
        (line,) = axes.plot(kelvin - 273.15, values, label=item.name, color=f"C{number}")
        if band:
            spread = np.array([_known(item._trail(property, t).uncertainty) for t in kelvin[::30]])
            wide = 2.0 * np.interp(kelvin, kelvin[::30], spread)
            axes.fill_between(
                kelvin - 273.15,
                # Beyond a half a band is a factor, up and down.
                values * np.where(wide < 0.5, 1.0 - wide, 1.0 / (1.0 + wide)),
                values * (1.0 + wide),
                color=line.get_color(),
                alpha=0.18,
                linewidth=0,
            )
        if points and isinstance(item, Liquid):
            for place, set_ in enumerate(pure_points(item.key, property)):
                inside = (set_.temperature >= low) & (set_.temperature <= high)
                axes.plot(
                    set_.temperature[inside] - 273.15,
                    display.in_stock(property, set_.value[inside]),
                    markers[place % len(markers)],
                    markersize=4,
                    markerfacecolor="none",
                    color=line.get_color(),
                    label=set_.source,
                )
    axes.set_xlabel("temperature [degC]")
    axes.set_ylabel(label(property))
    axes.legend(fontsize="small")
    return axes


def _known(uncertainty: float | None) -> float:
    """NaN, and so no band, where no uncertainty is known."""
    return float("nan") if uncertainty is None else uncertainty


def _ends(between: Any) -> tuple[float, float]:
    try:
        first, second = between
    except (TypeError, ValueError):
        raise BadInput(f"between is {between!r}", allowed="a pair of temperatures") from None
    low = units.single(first, "temperature", "between", plausible=True)
    high = units.single(second, "temperature", "between", plausible=True)
    if not low < high:
        raise BadInput(f"between runs from {low:g} to {high:g} K", allowed="a rising pair")
    return low, high
