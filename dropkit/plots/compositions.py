"""A mixture's property against composition, with the published points and the band."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

import numpy as np

from dropkit import units
from dropkit.errors import BadInput
from dropkit.plots.axes import axes_or_new, label, markers
from dropkit.properties import display
from dropkit.properties.composition import Composition, check_basis, from_mass, to_mass
from dropkit.properties.mixtures import Mixture
from dropkit.properties.other_chemicals import key_of
from dropkit.properties.points import pair_points
from dropkit.properties.property_words import property_name

if TYPE_CHECKING:
    from matplotlib.axes import Axes

__all__ = ["property_over_composition"]


def property_over_composition(
    first: str,
    second: str,
    *,
    property: str,
    at: Any,
    by: str = "mass",
    points: bool = True,
    band: bool = True,
    ax: Any = None,
) -> Axes:
    """Draw a property of a pair of components against the fraction of the first.

    Parameters
    ----------
    first, second : str
        Names of the components.
    property : str
        Such as ``"surface_tension"``.
    at : temperature or sequence of temperatures
        One curve each [K, or with a unit].
    by : {"mass", "mole", "volume"}
        Basis of the fraction on the axis.
    points : bool
        Show the published points within 0.3 K of each temperature.
    band : bool
        Shade the 95 % band.
    ax : matplotlib Axes, optional
        Where to draw; a new one by default.

    Returns
    -------
    matplotlib.axes.Axes
        In the trade's unit.

    Raises
    ------
    BadInput
        The two components are the same.
    MissingProperty
        The pair lacks the property.

    Examples
    --------
    >>> import dropkit as dk
    >>> ax = dk.plots.property_over_composition(
    ...     "glycerol", "water", property="viscosity", at="20 degC"
    ... )
    >>> ax.get_xlabel()
    'mass fraction of glycerol'
    """
    property_name(property)
    check_basis(by)
    keys = (key_of(first), key_of(second))
    if keys[0] == keys[1]:
        raise BadInput(f"{first} and {second} are the same", allowed="two components")
    axes = axes_or_new(ax)
    kelvins = np.ravel(
        np.asarray(units.to_si(at, "temperature", "at", plausible=True), dtype=float)
    )
    if not kelvins.size:
        raise BadInput("at is empty", allowed="one or more temperatures")
    share = np.linspace(0.0, 1.0, 201)
    mass = to_mass(keys, (share, 1.0 - share), by)
    pair = Mixture(Composition(keys, mass), estimates="allow", quiet=True)
    marks: dict[str, str] = {}
    for number, kelvin in enumerate(kelvins):
        values = display.in_stock(property, pair._evaluate(property, np.asarray(kelvin), "nan"))
        if not np.isfinite(values).any():
            pair._evaluate(property, np.asarray(kelvin), "raise")  # says what the range is
        colour = f"C{number}"
        axes.plot(share, values, color=colour, label=f"{kelvin - 273.15:g} degC")
        if band:
            wide = 2.0 * _spread(keys, mass, values, property, float(kelvin))
            axes.fill_between(
                share,
                # Beyond a half a band is a factor, up and down.
                values * np.where(wide < 0.5, 1.0 - wide, 1.0 / (1.0 + wide)),
                values * (1.0 + wide),
                color=colour,
                alpha=0.18,
                linewidth=0,
            )
        if not points:
            continue
        for found in pair_points(*keys, property):
            near = np.abs(found.temperature - kelvin) < 0.3
            if not near.any():
                continue
            a, b = sorted(keys)
            parts = to_mass((a, b), (found.fraction[near], 1.0 - found.fraction[near]), found.basis)
            shown = from_mass((a, b), parts, by)[0 if keys[0] == a else 1]
            fresh = found.source not in marks
            mark = marks.setdefault(found.source, markers[len(marks) % len(markers)])
            axes.plot(
                shown,
                display.in_stock(property, found.value[near]),
                mark,
                markersize=4,
                markerfacecolor="none",
                color=colour,
                label=found.source if fresh else None,
            )
    axes.set_xlabel(f"{by} fraction of {keys[0].replace('_', ' ')}")
    axes.set_ylabel(label(property))
    axes.legend(fontsize="small")
    return axes


def _spread(keys: tuple[str, str], mass: Any, values: Any, prop: str, kelvin: float) -> Any:
    """Relative standard uncertainty along the compositions; NaN, and so no band, without one."""
    places = np.arange(0, len(mass[0]), 5)
    found = []
    for k in places:
        if not np.isfinite(values[k]):
            found.append(np.nan)
            continue
        parts = Composition(keys, (float(mass[0][k]), float(mass[1][k])))
        known = Mixture(parts, estimates="allow", quiet=True)._trail(prop, kelvin).uncertainty
        found.append(np.nan if known is None else known)
    return np.interp(np.arange(len(mass[0])), places, found)
