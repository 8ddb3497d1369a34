"""What makes no one liquid, and what is taken for granted of what may."""

from __future__ import annotations

from collections.abc import Sequence
from typing import Final

from dropkit.errors import CompositionError, NotALiquid
from dropkit.properties.mixing.blends import Blend
from dropkit.records import LiquidRecord

__all__ = ["check_mixable", "taken_for_granted"]

# Each of these is a record of its own; what becomes of it in another liquid is not known here.
MELTS: Final = frozenset({"metal", "alloy", "melt"})
# Water dissolves less than 0.1 to 0.5 % of these, and they of it (common practice). A propellant
# is no liquid beside water at 1 atm; dimethyl ether, which dissolves under pressure, boils as well.
WATER_REPELLING: Final = frozenset(
    {"alkane", "cycloalkane", "aromatic", "terpene", "oil", "siloxane", "fluorinated", "fuel"}
    | {"acrylate", "propellant"}
)


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
    if len(entries) > 1 and any(entry.family in MELTS for entry in entries):
        raise CompositionError(
            f"{names}: a molten metal, alloy or other melt is not mixed with anything here",
            hint="Ask for each by itself; some alloys have a record of their own, such as "
            "'gallium_indium_eutectic'",
        )
    _check_unrecorded(entries)
    wet = {"water" if entry.key == "water" else entry.family for entry in entries}
    if "water" in wet and len(wet) > 1 and wet - {"water"} <= WATER_REPELLING:
        kinds = ", ".join(sorted(wet - {"water"}))
        raise CompositionError(
            f"{names}: water and a liquid of this family ({kinds}) do not mix but form two phases",
            hint="Ask for each by itself",
        )


def _check_unrecorded(entries: Sequence[LiquidRecord]) -> None:
    """For chemicals without a record of dropkit's own, of which only the formula is known."""
    wet = any(entry.key == "water" for entry in entries)
    for entry in entries if len(entries) > 1 else ():
        if entry.key != entry.cas:
            continue
        problem = ""
        if entry.molar_mass != entry.molar_mass:
            problem = "its molar mass is not known"
        elif entry.family == "inorganic":
            problem = "nothing says what it does to another liquid"
        elif wet and entry.family in ("hydrocarbon", "halogenated"):
            problem = "without oxygen or nitrogen, it hardly dissolves in water, nor water in it"
        if problem:
            raise CompositionError(
                f"{entry.name} ({entry.cas}) has no record of dropkit's own and is not mixed: "
                f"{problem}",
                hint="Ask for it by itself",
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
