"""Which liquids there are, and which one a name means.

Names resolve only through the names, synonyms and CAS numbers of dropkit's own records: no
engine is asked, so a name can't slip to another substance. Everything here reads the index
of the records, none of their files.
"""

from __future__ import annotations

from typing import TYPE_CHECKING

from dropkit.errors import AmbiguousName, BadInput, UnknownName, nearest
from dropkit.record_types import PROPERTIES
from dropkit.records import ambiguous_names, fold, index, summaries

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["liquids", "resolve"]


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


def liquids() -> pd.DataFrame:
    """All liquids and solutes that dropkit has records of.

    Returns
    -------
    pandas.DataFrame
        One row per record, by key: name, cas, formula, family, kind (liquid or solute), grade
        (the worst of density, viscosity and surface tension; missing where one of these is),
        and one column per property with the grade of its records, missing where there is none.

    Raises
    ------
    RecordError
        If two records share a name.

    Notes
    -----
    Reads the index only; ranges and sources stand in the records themselves.

    Examples
    --------
    >>> table = liquids()
    >>> table.loc["water", "cas"]
    '7732-18-5'
    >>> bool(table.loc["water", "viscosity":"surface_tension"].notna().all())
    True
    """
    import pandas as pd

    columns = ("name", "cas", "formula", "family", "kind", "grade")
    rows = {
        key: {name: entry[name] for name in columns}
        | {name: entry["properties"].get(name) for name in PROPERTIES}
        for key, entry in sorted(summaries().items())
    }
    table = pd.DataFrame.from_dict(rows, orient="index", columns=[*columns, *PROPERTIES])
    table.index.name = "key"
    return table
