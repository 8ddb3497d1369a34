"""One data folder: what was read of it, each file checked against its seal before use.

Nothing is read before it is asked for. Every first read holds one lock, so that many threads can
start at once; what was read is frozen and kept.
"""

from __future__ import annotations

import os
import re
import threading
from collections.abc import Callable, Mapping
from types import MappingProxyType
from typing import Any, Final, TypeVar

from dropkit.errors import RecordError, UnknownName, nearest
from dropkit.provenance import Source
from dropkit.record_index import (
    build_index,
    build_selection,
    fold,
    read_index,
    read_selection,
)
from dropkit.record_schema import read_interface, read_liquid, read_pair, read_source
from dropkit.record_thickeners import read_thickener
from dropkit.record_types import LiquidRecord, PairRecord, Table, ThickenerRecord

__all__ = [
    "AMBIGUOUS",
    "FORMAT",
    "INDEX",
    "LOCK",
    "MARKER",
    "SELECTION",
    "Store",
    "parse_file",
    "seal_of",
]

MARKER: Final = "dropkit-data.toml"
INDEX: Final = "index.json"
SELECTION: Final = "selection.json"
AMBIGUOUS: Final = "ambiguous.toml"
FORMAT: Final = 1

# Guards every first load: of a store, and of each file within it.
LOCK: Final = threading.RLock()

_Read = TypeVar("_Read")
_FILE_NAME: Final = re.compile(r"[^/\\:\x00-\x1f]+")


def parse_file(root: str, name: str) -> dict[str, Any]:
    """The parsed content of a TOML file of a data folder, or RecordError with the reason.

    Parameters
    ----------
    root : str
        The data folder.
    name : str
        The file within it, such as ``"liquids/water.toml"``.

    Returns
    -------
    dict
        Plain types.

    Raises
    ------
    RecordError
        If the file is missing, not UTF-8 or not TOML.
    """
    import tomllib

    try:
        with open(os.path.join(root, name), "rb") as file:
            return tomllib.loads(file.read().decode("utf-8"))
    except (OSError, UnicodeDecodeError, tomllib.TOMLDecodeError) as error:
        raise RecordError(
            f"data/{name} is unreadable: {error}",
            allowed="a TOML file in UTF-8, as data/README.md describes",
            hint="Restore the file, then run: python -m dropkit.records check",
        ) from error


def seal_of(data: Mapping[str, Any]) -> str:
    """The checksum of a parsed file: over its values, not its comments or layout.

    Parameters
    ----------
    data : mapping
        Parsed content; its own ``seal`` does not count.

    Returns
    -------
    str
        The first 32 hexadecimal digits of a SHA-256.
    """
    import hashlib
    import json

    content = {key: value for key, value in data.items() if key != "seal"}
    text = json.dumps(content, sort_keys=True, separators=(",", ":"), default=str)
    return hashlib.sha256(text.encode("utf-8")).hexdigest()[:32]


class Store:
    """One data folder and what was read of it.

    Parameters
    ----------
    root : str
        A folder that holds the marker ``dropkit-data.toml``.
    """

    def __init__(self, root: str) -> None:
        self.root = root
        self._liquids: dict[str, LiquidRecord] = {}
        self._pairs: dict[tuple[str, str], PairRecord | None] = {}
        self._interfaces: dict[tuple[str, str], PairRecord | None] = {}
        self._thickeners: dict[str, ThickenerRecord] = {}
        self._sources: dict[str, Source] = {}
        self._index: Mapping[str, Any] | None = None
        self._selection: Mapping[str, Any] | None = None
        self._ambiguous: Mapping[str, Any] | None = None
        self._version: str | None = None

    def version(self) -> str:
        """Version of the data; RecordError where the format is another than this code reads."""
        if self._version is None:
            marker = parse_file(self.root, MARKER)
            if marker.get("format") != FORMAT:
                raise RecordError(
                    f"data/{MARKER} has format {marker.get('format')!r}",
                    allowed=f"format {FORMAT}",
                    hint="Install data and dropkit of the same version",
                )
            self._version = str(marker.get("version", ""))
        return self._version

    def stems(self, folder: str) -> frozenset[str]:
        """Names of a folder's files without ``.toml``."""
        try:
            files = os.listdir(os.path.join(self.root, folder))
        except FileNotFoundError:
            return frozenset()
        return frozenset(file[:-5] for file in files if file.endswith(".toml"))

    def sealed(self, folder: str, stem: str) -> dict[str, Any]:
        """The parsed content of a file whose seal holds."""
        data = parse_file(self.root, f"{folder}/{stem}.toml")
        if data.get("seal") != seal_of(data):
            state = "has changed since it was sealed" if "seal" in data else "is not sealed"
            raise RecordError(
                f"data/{folder}/{stem}.toml {state}",
                allowed="a file as it was sealed",
                hint="Undo the change; or, if it is meant, run: "
                f"python -m dropkit.records seal {folder}/{stem}",
            )
        return data

    def liquid(self, key: str) -> LiquidRecord:
        """The record of a liquid or solute."""
        found = self._liquids.get(key)
        if found is None:
            with LOCK:
                found = self._liquids.get(key)
                if found is None:
                    if not self._holds("liquids", key):
                        stems = self.stems("liquids")
                        raise UnknownName(
                            f"there is no record of a liquid '{key}'",
                            allowed="a name listed by dropkit.liquids()",
                            choices=nearest(str(key), stems),
                        )
                    found = read_liquid(key, self.sealed("liquids", key))
                    self._liquids[key] = found
        return found

    def adopt(self, record: LiquidRecord) -> None:
        """Hold a record that no file gives, under its own key."""
        with LOCK:
            self._liquids.setdefault(record.key, record)

    def pair(self, first: str, second: str) -> PairRecord | None:
        """The record of a pair in any order, None where there is none."""
        pair = (first, second) if first < second else (second, first)
        try:
            return self._pairs[pair]
        except KeyError:
            pass
        with LOCK:
            if pair not in self._pairs:
                stem = "__".join(pair)
                self._pairs[pair] = (
                    read_pair(stem, self.sealed("mixtures", stem))
                    if self._holds("mixtures", stem)
                    else None
                )
            return self._pairs[pair]

    def interface(self, first: str, second: str) -> PairRecord | None:
        """The record of two liquids in contact, in any order; None where there is none."""
        pair = (first, second) if first < second else (second, first)
        with LOCK:
            if pair not in self._interfaces:
                stem = "__".join(pair)
                self._interfaces[pair] = (
                    read_interface(stem, self.sealed("interfaces", stem))
                    if self._holds("interfaces", stem)
                    else None
                )
            return self._interfaces[pair]

    def thickener(self, key: str) -> ThickenerRecord:
        """The record of a dissolved polymer."""
        with LOCK:
            if key not in self._thickeners:
                if not self._holds("thickeners", key):
                    raise UnknownName(
                        f"there is no record of a thickener '{key}'",
                        allowed="the name of a file in data/thickeners, without .toml",
                        choices=nearest(str(key), self.stems("thickeners")),
                    )
                self._thickeners[key] = read_thickener(key, self.sealed("thickeners", key))
            return self._thickeners[key]

    def source(self, key: str) -> Source:
        """A publication."""
        found = self._sources.get(key)
        if found is None:
            with LOCK:
                found = self._sources.get(key)
                if found is None:
                    if not self._holds("sources", key):
                        raise UnknownName(
                            f"there is no source '{key}'",
                            allowed="the name of a file in data/sources, without .toml",
                            choices=nearest(str(key), self.stems("sources")),
                        )
                    found = read_source(key, parse_file(self.root, f"sources/{key}.toml"))
                    self._sources[key] = found
        return found

    def _holds(self, folder: str, stem: str) -> bool:
        # The pattern keeps a name from leaving the folder; the listing, unlike a look at the
        # file, tells upper from lower case on every system.
        return (
            isinstance(stem, str)
            and _FILE_NAME.fullmatch(stem) is not None
            and stem in self.stems(folder)
        )

    def ambiguous(self) -> Mapping[str, Any]:
        """Names that stand for several liquids, from ``data/ambiguous.toml``."""
        with LOCK:
            if self._ambiguous is None:
                held = os.path.isfile(os.path.join(self.root, AMBIGUOUS))
                self._ambiguous = Table(parse_file(self.root, AMBIGUOUS) if held else {})
            return self._ambiguous

    def index(self) -> Mapping[str, Any]:
        """The generated index; the files themselves are scanned where it doesn't match them."""
        found = self._index
        if found is None:
            with LOCK:
                if self._index is None:
                    content = self._read_index() or self.scan()
                    self._index = {
                        name: MappingProxyType(part) if isinstance(part, dict) else part
                        for name, part in content.items()
                    }
                found = self._index
        return found

    def _read_index(self) -> Mapping[str, Any] | None:
        try:
            with open(os.path.join(self.root, INDEX), "rb") as file:
                content = read_index(file.read())
            fits = all(
                content[folder].keys() == self.stems(folder) for folder in ("liquids", "mixtures")
            )
            return content if fits else None
        except (OSError, ValueError, LookupError, TypeError, AttributeError):
            return None

    def selection(self) -> Mapping[str, Any]:
        """What choosing needs of each liquid; read from the files where the table doesn't fit."""
        found = self._selection
        if found is None:
            with LOCK:
                if self._selection is None:
                    held = self._read_selection()
                    if held is None:
                        liquids, _ = self._scan_folder("liquids", read_liquid)
                        held = build_selection(liquids)["liquids"]
                    self._selection = MappingProxyType(held)
                found = self._selection
        return found

    def _read_selection(self) -> dict[str, Any] | None:
        """The table as it was generated, if it is whole and made from the records of the index."""
        try:
            with open(os.path.join(self.root, SELECTION), "rb") as file:
                return read_selection(file.read(), self.index()["records"])
        except (OSError, ValueError, LookupError, TypeError, AttributeError):
            return None

    def scan(self) -> dict[str, Any]:
        """The index made from the files; an unreadable one is found by its file's name only."""
        return self.scan_all()[0]

    def scan_all(self) -> tuple[dict[str, Any], dict[str, Any]]:
        """Index and selection, both made from the files."""
        liquids, broken = self._scan_folder("liquids", read_liquid)
        mixtures, _ = self._scan_folder("mixtures", read_pair)
        content = build_index(liquids, mixtures, self.ambiguous())
        for stem in broken:
            # Asking for it then gives the file's own error.
            content["names"].setdefault(fold(stem), stem)
        return content, build_selection(liquids)

    def _scan_folder(
        self, folder: str, read: Callable[[str, Mapping[str, Any]], _Read]
    ) -> tuple[list[tuple[_Read, str]], list[str]]:
        good, broken = [], []
        for stem in sorted(self.stems(folder)):
            try:
                data = parse_file(self.root, f"{folder}/{stem}.toml")
                good.append((read(stem, data), str(data.get("seal", ""))))
            except RecordError:
                broken.append(stem)
        return good, broken
