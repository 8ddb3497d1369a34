"""What all pictures share: an Axes to draw on, and words for axes."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any

from dropkit.errors import DropkitError
from dropkit.properties import display

if TYPE_CHECKING:
    from matplotlib.axes import Axes

__all__ = ["axes_or_new", "label", "markers"]

markers = ("o", "s", "^", "D", "v", "P", "X", "<", ">", "*")


def axes_or_new(ax: Any) -> Axes:
    """The Axes given, or a new one."""
    if ax is not None:
        found: Axes = ax
        return found
    try:
        from matplotlib import pyplot
    except ModuleNotFoundError as problem:
        raise DropkitError(
            "Pictures need matplotlib, which is not installed",
            hint="Install dropkit with its extra 'plots'",
        ) from problem
    fresh: Axes = pyplot.figure(figsize=(6.4, 4.2), layout="constrained").add_subplot()
    return fresh


def label(prop: str) -> str:
    """Words and unit of a property for an axis."""
    unit = display.unit_of(prop)
    words = prop.replace("_", " ")
    return words if unit == "-" else f"{words} [{unit}]"
