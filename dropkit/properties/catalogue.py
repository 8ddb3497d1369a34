"""Which liquids there are, and which one a name means.

Names resolve only through the names, synonyms and CAS numbers of dropkit's own records: no
engine is asked, so a name can't slip to another substance. Everything here reads the index
of the records, none of their files.
"""

from __future__ import annotations

import re
from typing import TYPE_CHECKING, Final

from dropkit.errors import AmbiguousName, BadInput, UnknownName, nearest
from dropkit.record_index import CAS_NUMBER
from dropkit.record_types import PROPERTIES
from dropkit.records import ambiguous_names, fold, index, summaries

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["family_names", "liquids", "resolve"]

# One element with its number, or a bracket; numbers short enough for any text to be read.
_PIECE: Final = re.compile(r"([A-Z][a-z]?)([0-9]{0,4})|(\()|\)([0-9]{0,4})")


def resolve(name: str) -> str:
    """The key of the liquid or solute that a name means.

    Holds for the names, synonyms, trade short forms and CAS numbers of dropkit's records;
    capitals, spaces, underscores and hyphens don't matter.

    Parameters
    ----------
    name : str
        Such as ``"glycerol"``, ``"Ethylene glycol"``, ``"IPA"``, ``"DI water"``, ``"67-64-1"``.

    Returns
    -------
    str
        The key of its record.

    Raises
    ------
    UnknownName
        If no record has that name; says the nearest ones.
    AmbiguousName
        If it stands for several liquids; says which.
    BadInput
        If it is no text.

    Notes
    -----
    There is no equation and no range: a name is known or it isn't.

    Examples
    --------
    >>> resolve("Glycerine"), resolve("56-81-5"), resolve("di-water")
    ('glycerol', 'glycerol', 'water')
    """
    if not isinstance(name, str):
        raise BadInput(
            f"{name!r} is no name of a liquid", allowed="a text such as 'water' or 'glycerol'"
        )
    folded = fold(name)
    key = index().get(folded)
    if key is not None:
        return key
    _raise_if_ambiguous(name, folded)
    raise UnknownName(
        f"no liquid is called '{name}'",
        allowed="a name, synonym or CAS number listed by dropkit.liquids()",
        choices=_suggestions(name, folded),
        hint="dropkit.fluid() makes a liquid of your own from a few numbers",
    )


def _raise_if_ambiguous(name: str, folded: str) -> None:
    for unclear, entry in ambiguous_names().items():
        if fold(unclear) != folded:
            continue
        known = index()
        held = [choice for choice in entry["choices"] if fold(choice) in known]
        hint = entry.get("note", "")
        if not held:
            hint = f"{hint}. None of them has a record yet".lstrip(". ")
        raise AmbiguousName(
            f"'{name}' stands for several liquids",
            allowed=", ".join(entry["choices"]),
            choices=held or entry["choices"],
            hint=hint,
        )


def _suggestions(name: str, folded: str) -> list[str]:
    """Up to three liquids: those of that formula, then those whose names look most like it."""
    entries = summaries()
    found = {
        key: entry["name"]
        for key, entry in entries.items()
        if fold(entry["formula"]) == folded and folded
    }
    owners: dict[str, str] = {}
    for key, entry in entries.items():
        for known in (entry["name"], *entry["synonyms"]):
            owners.setdefault(known, key)
    for close in nearest(name, owners, 8):
        found.setdefault(owners[close], close)
    return list(found.values())[:3]


def family_names() -> list[str]:
    """Families of the liquids and solutes that there are records of, in alphabetical order."""
    return sorted({entry["family"] for entry in summaries().values()})


def _atoms(text: str) -> dict[str, int] | None:
    """How many atoms of each element a formula has, however written; None for other texts."""
    levels: list[dict[str, int]] = [{}]
    place = 0
    for piece in _PIECE.finditer(text):
        if piece.start() != place:
            return None
        place = piece.end()
        element, count, opens, times = piece.groups()
        if opens:
            levels.append({})
            continue
        if element:
            inner, factor = {element: int(count or 1)}, 1
        elif len(levels) > 1:
            inner, factor = levels.pop(), int(times or 1)
        else:
            return None
        for name, number in inner.items():
            levels[-1][name] = levels[-1].get(name, 0) + factor * number
    return levels[0] if place == len(text) and len(levels) == 1 and levels[0] else None


def _matching(search: str) -> set[str]:
    """Keys of the records that a search means; UnknownName or AmbiguousName where there is none."""
    if not isinstance(search, str) or not fold(search):
        raise BadInput(
            f"search={search!r} is nothing to look for",
            allowed="part of a name or synonym, a CAS number, a formula or a family",
        )
    folded = fold(search)
    known, entries = index(), summaries()
    found = {
        key
        for name, key in known.items()
        if name == folded or (folded in name and not CAS_NUMBER.fullmatch(name))
    }
    atoms = _atoms(search.strip())
    for key, entry in entries.items():
        formula = entry["formula"]
        if folded in (fold(formula), fold(entry["family"])) or (
            atoms is not None and atoms == _atoms(formula)
        ):
            found.add(key)
    for unclear, entry in ambiguous_names().items():
        if fold(unclear) == folded:
            found |= {known[fold(choice)] for choice in entry["choices"] if fold(choice) in known}
    if found:
        return found
    if len(folded) > 3 and folded.endswith("s"):  # alcohols, glycols
        return _matching(folded[:-1])
    _raise_if_ambiguous(search, folded)
    held = family_names()
    raise UnknownName(
        f"no liquid matches '{search}'",
        allowed="part of a name or synonym, a CAS number, a formula, or a family: "
        + ", ".join(held),
        choices=list(dict.fromkeys([*nearest(search, held, 1), *_suggestions(search, folded)]))[:3],
        hint=f"dropkit.liquid({search.strip()!r}) asks the engines"
        if CAS_NUMBER.fullmatch(folded)
        else "dropkit.liquids() lists all",
    )


def liquids(search: str | None = None) -> pd.DataFrame:
    """All liquids and solutes that dropkit has records of, or those that a search finds.

    Holds for what the records say: a part of a name or synonym, a CAS number, a formula or a
    family; capitals, spaces, underscores and hyphens don't matter.

    Parameters
    ----------
    search : str, optional
        Such as ``"glycol"``, ``"64-17-5"``, ``"C3H8O"`` (also written ``"CH3CHOHCH3"`` or
        ``"(CH3)2CO"``), ``"alcohol"``; everything without it.

    Returns
    -------
    pandas.DataFrame
        One row per record, by key: name, cas, formula, family, kind (liquid or solute), grade
        (the worst of density, viscosity and surface tension; missing where one of these is),
        and one column per property with the grade of its records, missing where there is none.

    Raises
    ------
    UnknownName
        If a search finds nothing; says the nearest names and the families.
    AmbiguousName
        If it stands for several liquids and none of them has a record.
    BadInput
        If `search` is no text, or an empty one.
    RecordError
        If two records share a name.

    Notes
    -----
    There is no equation and no range. Reads the index only; ranges and sources stand in the
    records themselves. A formula finds all its isomers, a family all its members and whatever
    else has the word in its name.

    Examples
    --------
    >>> table = liquids()
    >>> table.loc["water", "cas"]
    '7732-18-5'
    >>> bool(table.loc["water", "viscosity":"surface_tension"].notna().all())
    True
    >>> list(liquids("C3H8O").index)
    ['1-propanol', '2-propanol']
    >>> liquids("64-17-5").loc["ethanol", "family"]
    'alcohol'
    """
    import pandas as pd

    chosen = None if search is None else sorted(_matching(search))
    columns = ("name", "cas", "formula", "family", "kind", "grade")
    rows = {
        key: {name: entry[name] for name in columns}
        | {name: entry["properties"].get(name) for name in PROPERTIES}
        for key, entry in sorted(summaries().items())
    }
    table = pd.DataFrame.from_dict(rows, orient="index", columns=[*columns, *PROPERTIES])
    table.index.name = "key"
    return table if chosen is None else table.loc[chosen]
