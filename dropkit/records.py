"""Finds dropkit's data and gives its records: lazily, one file at a time, seals checked.

``python -m dropkit.records seal`` seals files after a change and writes the index of names;
``python -m dropkit.records check`` only looks. The format stands in ``data/README.md``.
"""

from __future__ import annotations

import os
from collections.abc import Mapping
from typing import TYPE_CHECKING, Any, cast

from dropkit.errors import RecordError
from dropkit.provenance import Source
from dropkit.record_index import fold
from dropkit.record_store import LOCK, MARKER, Store
from dropkit.record_types import (
    LiquidRecord,
    PairRecord,
    PropertyRecord,
    Table,
    ThickenerRecord,
)

if TYPE_CHECKING:
    from pathlib import Path

__all__ = [
    "LOCK",
    "LiquidRecord",
    "PairRecord",
    "PropertyRecord",
    "Store",
    "Table",
    "ThickenerRecord",
    "adopt",
    "ambiguous_names",
    "data_dir",
    "data_version",
    "fold",
    "index",
    "interface_record",
    "interfaces",
    "liquid_record",
    "pair_record",
    "pairs",
    "selection",
    "source",
    "summaries",
    "thickener_records",
]

_STORE: Store | None = None


def _store() -> Store:
    global _STORE
    store = _STORE
    if store is None:
        with LOCK:
            if _STORE is None:
                _STORE = Store(_find())
            store = _STORE
    return store


def _find() -> str:
    package = os.path.dirname(os.path.realpath(__file__))
    for folder in (os.path.join(package, "data"), os.path.join(os.path.dirname(package), "data")):
        if os.path.isfile(os.path.join(folder, MARKER)):
            return folder
    raise RecordError(
        f"dropkit's data folder is missing: no {MARKER} in dropkit/data or beside dropkit",
        allowed="a complete installation or checkout",
        hint="Install dropkit again",
    )


def data_dir() -> Path:
    """The folder that holds dropkit's data.

    Returns
    -------
    Path
        ``dropkit/data`` of an installed wheel, ``data`` of a checkout.

    Raises
    ------
    RecordError
        If neither holds the marker ``dropkit-data.toml``.

    Examples
    --------
    >>> (data_dir() / "README.md").is_file()
    True
    """
    # Imported here: it costs more than reading a record.
    from pathlib import Path

    return Path(_store().root)


def data_version() -> str:
    """Version of the data that results are computed from.

    Returns
    -------
    str
        As stated in ``dropkit-data.toml``.

    Raises
    ------
    RecordError
        If the data have a format that this version of dropkit doesn't read.

    Examples
    --------
    >>> data_version() != ""
    True
    """
    return _store().version()


def liquid_record(key: str) -> LiquidRecord:
    """All that the data hold on one liquid or solute.

    Parameters
    ----------
    key : str
        Name of its file without ``.toml``; `dropkit.properties.catalogue.resolve` turns any
        name into it.

    Returns
    -------
    LiquidRecord
        Frozen; read once and kept.

    Raises
    ------
    UnknownName
        If there is no such file.
    RecordError
        If the file is unreadable, breaks the format, or has changed since it was sealed.

    Examples
    --------
    >>> liquid_record("water").cas
    '7732-18-5'
    """
    return _store().liquid(key)


def adopt(record: LiquidRecord) -> None:
    """Hold a record that no file gives, so that `liquid_record` finds it; for the engines.

    Parameters
    ----------
    record : LiquidRecord
        Its key must be no file's name: a CAS number.
    """
    _store().adopt(record)


def pair_record(first: str, second: str) -> PairRecord | None:
    """All that the data hold on a pair.

    Parameters
    ----------
    first, second : str
        Keys of the components, in any order.

    Returns
    -------
    PairRecord or None
        None where the pair has no record.

    Raises
    ------
    RecordError
        If the file is unreadable, breaks the format, or has changed since it was sealed.

    Examples
    --------
    >>> pair_record("water", "glycerol").components
    ('glycerol', 'water')
    """
    return _store().pair(first, second)


def interface_record(first: str, second: str) -> PairRecord | None:
    """What the data hold on two liquids in contact: their interfacial tension.

    Parameters
    ----------
    first, second : str
        Keys of the liquids, in any order.

    Returns
    -------
    PairRecord or None
        None where the pair has no record.

    Raises
    ------
    RecordError
        If the file is unreadable, breaks the format, or has changed since it was sealed.

    Examples
    --------
    >>> interface_record("water", "mercury").components
    ('mercury', 'water')
    """
    return _store().interface(first, second)


def interfaces() -> tuple[tuple[str, str], ...]:
    """Pairs of liquids in contact that have a record, from the names of its files.

    Returns
    -------
    tuple of tuple of str
        Pairs of keys, each alphabetical, in order.

    Examples
    --------
    >>> ("mercury", "water") in interfaces()
    True
    """
    stems = sorted(_store().stems("interfaces"))
    return tuple((first, second) for first, _, second in (s.partition("__") for s in stems))


def thickener_records() -> Mapping[str, ThickenerRecord]:
    """All that the data hold on dissolved polymers; their files are few and small.

    Returns
    -------
    mapping of str to ThickenerRecord
        By key, in alphabetical order.

    Raises
    ------
    RecordError
        If a file is unreadable, breaks the format, or has changed since it was sealed.

    Examples
    --------
    >>> thickener_records()["sodium_alginate"].charge
    'anionic'
    """
    store = _store()
    return {key: store.thickener(key) for key in sorted(store.stems("thickeners"))}


def source(key: str) -> Source:
    """The publication behind a source key.

    Parameters
    ----------
    key : str
        Name of its file in ``data/sources`` without ``.toml``.

    Returns
    -------
    Source
        Citation, DOI and how it was seen.

    Raises
    ------
    UnknownName
        If there is no such source.
    RecordError
        If its file is unreadable or breaks the format.
    """
    return _store().source(key)


def index() -> Mapping[str, str]:
    """Every name that dropkit knows, and the key that it stands for.

    Returns
    -------
    mapping of str to str
        Names, synonyms and CAS numbers as `fold` writes them, to keys.

    Raises
    ------
    RecordError
        If two records share a name.

    Examples
    --------
    >>> index()[fold("Glycerine")]
    'glycerol'
    """
    return cast(Mapping[str, str], _store().index()["names"])


def summaries() -> Mapping[str, Mapping[str, Any]]:
    """What the index tells of each liquid and solute, without reading its file.

    Returns
    -------
    mapping of str to mapping
        Key to name, cas, formula, family, kind, grade, synonyms and properties (with grades).

    Examples
    --------
    >>> summaries()["water"]["family"]
    'water'
    """
    return cast(Mapping[str, Mapping[str, Any]], _store().index()["liquids"])


def selection() -> Mapping[str, Mapping[str, Any]]:
    """Constants and equations of every liquid in short form, without reading its file.

    Returns
    -------
    mapping of str to mapping
        Key to what `dropkit.record_index.build_selection` says of it; solutes are left out.

    Raises
    ------
    RecordError
        If two records share a name.

    Examples
    --------
    >>> selection()["water"]["constants"]["boiling_point"]
    373.124
    """
    return _store().selection()


def pairs() -> Mapping[tuple[str, str], Mapping[str, str]]:
    """What the index tells of each pair, without reading its file.

    Returns
    -------
    mapping of tuple to mapping
        Pair of keys, alphabetical, to its properties and their grades.
    """
    return {
        (entry["components"][0], entry["components"][1]): entry["properties"]
        for entry in _store().index()["mixtures"].values()
    }


def ambiguous_names() -> Mapping[str, Any]:
    """Names that stand for several liquids.

    Returns
    -------
    mapping of str to mapping
        Name to its ``choices`` and, where one helps, a ``note``.
    """
    return _store().ambiguous()


if __name__ == "__main__":
    from dropkit.sealing import main

    raise SystemExit(main())
