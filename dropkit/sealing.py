"""The commands ``python -m dropkit.records seal`` and ``check``.

``seal [names]`` checks files (all of them without names), writes the checksum of each good one
into its ``seal`` line, and rewrites ``data/index.json`` and ``data/selection.json``.
``check [names]`` does the same without writing, and also reports seals that don't hold. Both end
with 1 where something is wrong.
"""

from __future__ import annotations

import os
import re
import sys
import tomllib
from collections.abc import Callable, Mapping, Sequence
from pathlib import Path
from typing import Any, Final, TypeAlias

from dropkit.errors import RecordError, nearest
from dropkit.record_index import index_text, selection_text
from dropkit.record_rules import problems
from dropkit.record_schema import read_interface, read_liquid, read_pair
from dropkit.record_store import (
    INDEX,
    SELECTION,
    Store,
    parse_file,
    seal_of,
)
from dropkit.record_thickeners import read_thickener
from dropkit.record_types import LiquidRecord, PairRecord, ThickenerRecord
from dropkit.records import data_dir

__all__ = ["main", "sealed_text"]

Record: TypeAlias = LiquidRecord | PairRecord | ThickenerRecord
READERS: Final[dict[str, Callable[[str, Mapping[str, Any]], Record]]] = {
    "liquids": read_liquid,
    "mixtures": read_pair,
    "interfaces": read_interface,
    "thickeners": read_thickener,
}

_SEAL_LINE: Final = re.compile(r"^seal[ \t]*=[^\r\n]*", re.MULTILINE)
# The first table, with the blank lines and comments that lead to it.
_TABLE_LINE: Final = re.compile(r"^(?:[ \t]*(?:#[^\r\n]*)?\r?\n)*\[", re.MULTILINE)


def sealed_text(text: str, seal: str) -> str:
    """The text of a TOML file with its seal line set, everything else untouched.

    Parameters
    ----------
    text : str
        The file's text.
    seal : str
        The checksum.

    Returns
    -------
    str
        The same text; the seal stands where it stood, or before the first table.

    Raises
    ------
    RecordError
        If no such line can be set without changing the file's meaning.
    """
    newline = "\r\n" if "\r\n" in text else "\n"
    line = f'seal = "{seal}"'
    candidates = []
    if match := _SEAL_LINE.search(text):
        candidates.append(text[: match.start()] + line + text[match.end() :])
    if match := _TABLE_LINE.search(text):
        candidates.append(text[: match.start()] + line + newline + text[match.start() :])
    candidates.append(line + newline + text)
    content = seal_of(tomllib.loads(text))
    for candidate in candidates:
        try:
            data = tomllib.loads(candidate)
        except tomllib.TOMLDecodeError:
            continue
        if data.get("seal") == seal and seal_of(data) == content:
            return candidate
    raise RecordError("no place for the seal line", hint='Write seal = "" before the first table')


class _Run:
    """One run of a command over a data folder."""

    def __init__(self, store: Store, *, write: bool) -> None:
        self.store, self.write = store, write
        self.bad: list[str] = []
        self.sealed = self.unchanged = 0

    def chosen(self, names: Sequence[str]) -> list[tuple[str, str]]:
        """The files that some names mean: keys, pairs ``a__b``, or ``liquids/key``."""
        files = [(f, stem) for f in READERS for stem in sorted(self.store.stems(f))]
        if not names:
            return files
        found = []
        for name in names:
            plain = name.replace(os.sep, "/").removeprefix("data/").removesuffix(".toml")
            hits = [file for file in files if plain in (file[1], "/".join(file))]
            found.extend(hits)
            if not hits:
                near = nearest(plain, [stem for _, stem in files], 1)
                guess = f"; did you mean {near[0]}?" if near else ""
                self.bad.append(f"{name}: no such file in data/{', data/'.join(READERS)}{guess}")
        return found

    def file(self, folder: str, stem: str) -> None:
        """Check one file, and seal it where that is the command and nothing is wrong."""
        name = f"{folder}/{stem}.toml"
        try:
            data = parse_file(self.store.root, name)
            found = problems(self.store, READERS[folder](stem, data))
        except RecordError as error:
            self.bad.append(str(error))
            return
        subject = f"{folder}/{stem}: "
        self.bad.extend(f"data/{name}: {text.removeprefix(subject)}" for text in found)
        if found:
            return
        seal = seal_of(data)
        if data.get("seal") == seal:
            self.unchanged += 1
        elif self.write:
            path = Path(self.store.root, name)
            _replace(path, sealed_text(path.read_bytes().decode("utf-8"), seal))
            self.sealed += 1
        else:
            self.bad.append(
                f"data/{folder}/{stem}.toml has changed since it was sealed; "
                f"run: python -m dropkit.records seal {folder}/{stem}"
            )

    def index(self) -> None:
        """Compare the generated files with the others, and rewrite them if that is the command."""
        try:
            content, selection = self.store.scan_all()
        except RecordError as error:
            self.bad.append(str(error))
            return
        for name, text in (
            (INDEX, index_text(content)),
            (SELECTION, selection_text(selection)),
        ):
            path = Path(self.store.root, name)
            if path.is_file() and path.read_text(encoding="utf-8") == text:
                continue
            if self.write:
                _replace(path, text)
            else:
                self.bad.append(
                    f"data/{name} does not match the files; run: python -m dropkit.records seal"
                )


def _replace(path: Path, text: str) -> None:
    """Write a file in one step, so that nobody reads half of it."""
    part = path.with_name(f"{path.name}.{os.getpid()}.part")
    part.write_bytes(text.encode("utf-8"))
    if path.exists():
        part.chmod(path.stat().st_mode)
    os.replace(part, path)


def main(arguments: Sequence[str] | None = None, root: str | Path | None = None) -> int:
    """Run a command.

    Parameters
    ----------
    arguments : sequence of str, optional
        ``seal`` or ``check``, then names; the command line's own by default.
    root : path, optional
        The data folder; dropkit's own by default.

    Returns
    -------
    int
        0 where all is well, 1 where something is wrong, 2 for an unknown command.
    """
    command, *names = list(sys.argv[1:] if arguments is None else arguments) or [""]
    if command not in ("seal", "check"):
        print("usage: python -m dropkit.records seal|check [names]", file=sys.stderr)
        return 2
    run = _Run(Store(str(data_dir() if root is None else root)), write=command == "seal")
    files = run.chosen(names)
    for folder, stem in files:
        run.file(folder, stem)
    run.index()
    for text in run.bad:
        print(text, file=sys.stderr)
    done = f"{run.sealed} sealed, " if run.write else ""
    print(f"{len(files)} files: {done}{run.unchanged} unchanged, {len(run.bad)} problems")
    return 1 if run.bad else 0
