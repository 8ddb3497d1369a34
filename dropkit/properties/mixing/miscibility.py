"""What makes no one liquid, and what is taken for granted of what may."""

from __future__ import annotations

from collections.abc import Sequence
from typing import Final

from dropkit.errors import CompositionError, NotALiquid
from dropkit.properties.mixing.blends import Blend
from dropkit.records import LiquidRecord

__all__ = ["check_mixable", "taken_for_granted"]

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


def taken_for_granted(rule: Blend) -> list[str]:
    """What one property of a mixture assumes where no record says it.

    Parameters
    ----------
    rule : Blend
        How the property is put together.

    Returns
    -------
    list of str
        One text for each assumption.
    """
    texts = []
    if len(rule.solvents) > 2:
        texts.append("no ternary terms: each pair enters at its own ratio")
    texts += [
        f"{rule.records[i].name} + {rule.records[j].name}: no measured record, no excess, one "
        "phase taken for granted"
        for i, j in rule.unfitted
    ]
    if rule.solutes and len(rule.solvents) > 1:
        texts.append(
            "the salt acts on the mixed solvent as it does on water; its whole effect counts as "
            "uncertain"
        )
    return texts
