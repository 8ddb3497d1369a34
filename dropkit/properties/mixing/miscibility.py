"""What makes no one liquid: solids alone, molten metals with others, water with hydrocarbons."""

from __future__ import annotations

from collections.abc import Sequence
from typing import Final

from dropkit.errors import CompositionError, NotALiquid
from dropkit.records import LiquidRecord

__all__ = ["check_mixable"]

# Water dissolves less than 0.1 % of these, and they of it (common practice).
HYDROCARBONS: Final = frozenset({"alkane", "aromatic"})


def check_mixable(entries: Sequence[LiquidRecord]) -> None:
    """Raise where some components can't be one liquid phase.

    Parameters
    ----------
    entries : sequence of LiquidRecord
        The components that are present.

    Raises
    ------
    NotALiquid
        Nothing but solids.
    CompositionError
        Two liquid phases for certain.
    """
    names = ", ".join(entry.name for entry in entries)
    if all(entry.kind != "liquid" for entry in entries):
        raise NotALiquid(
            f"{names}: a mixture needs a liquid",
            hint="Add the solvent, such as 'water': 'rest'",
        )
    if len({entry.family == "metal" for entry in entries}) > 1:
        raise CompositionError(
            f"{names}: a molten metal does not mix with other liquids",
            hint="Ask for each by itself",
        )
    wet = {"water" if entry.key == "water" else entry.family for entry in entries}
    if "water" in wet and len(wet) > 1 and wet - {"water"} <= HYDROCARBONS:
        raise CompositionError(
            f"{names}: water and hydrocarbons do not mix but form two liquids",
            hint="Ask for each by itself",
        )
