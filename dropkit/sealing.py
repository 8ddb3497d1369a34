"""The commands ``python -m dropkit.records seal`` and ``check``.

``seal [names]`` checks files (all of them without names), writes the checksum of each good one
into its ``seal`` line, and rewrites ``data/index.json``. ``check [names]`` does the same without
writing, and also reports seals that don't hold. Both end with 1 where something is wrong.
"""

from __future__ import annotations

import json
import os
import re
import sys
import tempfile
import tomllib
from collections.abc import Iterator, Sequence
from pathlib import Path
from typing import Final

from dropkit.errors import RecordError, nearest
from dropkit.record_schema import read_liquid, read_pair
from dropkit.record_store import INDEX, Store, parse_file, seal_of
from dropkit.record_types import LiquidRecord, PairRecord, PropertyRecord
from dropkit.records import data_dir

__all__ = ["grade_problems", "main", "problems", "sealed_text", "source_keys"]

FOLDERS: Final = ("liquids", "mixtures")
# An archive: its rows carry the DOI of the paper, each an independent source.
ARCHIVES: Final = ("ThermoMLArchive",)
LEAST_RECALLED: Final = 0.05

_SEAL_LINE: Final = re.compile(r"^seal[ \t]*=[^\r\n]*", re.MULTILINE)
_TABLE_LINE: Final = re.compile(r"^\[", re.MULTILINE)


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
    for match in _TABLE_LINE.finditer(text):
        candidates.append(text[: match.start()] + line + newline + text[match.start() :])
        break
    candidates.append(line + newline + text)
    wanted = {**tomllib.loads(text), "seal": seal}
    for candidate in candidates:
        try:
            if tomllib.loads(candidate) == wanted:
                return candidate
        except tomllib.TOMLDecodeError:
            continue
    raise RecordError("no place for the seal line", hint='Write seal = "" before the first table')


def source_keys(record: LiquidRecord | PairRecord) -> Iterator[tuple[str, str]]:
    """Where each source key of a record stands, and the key."""
    if isinstance(record, LiquidRecord):
        for name, fact in record.facts.items():
            yield name, fact["source"]
    for blocks in record.properties.values():
        for block in blocks:
            for key in block.sources:
                yield block.label, key
            if block.second is not None:
                for key in _second_sources(block):
                    yield f"{block.label}: second", key
            for check in block.checks:
                yield f"{block.label}: check at {check['T']:g} K", check["source"]


def _second_sources(block: PropertyRecord) -> tuple[str, ...]:
    if block.second is None:
        return ()
    return tuple(dict.fromkeys((block.second["source"], *block.second.get("sources", ()))))


def grade_problems(block: PropertyRecord) -> list[str]:
    """What a record lacks for the grade that it claims.

    Parameters
    ----------
    block : PropertyRecord
        The record.

    Returns
    -------
    list of str
        Empty where the grade is deserved.
    """
    found = []
    own = set(block.sources)
    second = set(_second_sources(block))
    everybody = own | second
    if block.grade == "measured":
        if block.second is None:
            found.append("grade 'measured' needs an independent check: second = { ... }")
        if len(everybody) < 2 and not everybody & set(ARCHIVES):
            found.append("grade 'measured' needs two independent sources")
    if block.grade == "reference":
        checked = second | {check["source"] for check in block.checks}
        if not checked - own:
            found.append(
                "grade 'reference' needs one independent check: second or a check point "
                "whose source is not among sources"
            )
    if block.grade == "recalled" and block.uncertainty < LEAST_RECALLED:
        found.append(
            f"grade 'recalled' needs an uncertainty of at least {LEAST_RECALLED}, "
            f"not {block.uncertainty:g}"
        )
    if block.grade in ("own", "estimated"):
        found.append(f"grade '{block.grade}' is for results, not for data files")
    return [f"{block.label}: {text}" for text in found]


def problems(store: Store, record: LiquidRecord | PairRecord) -> list[str]:
    """What is wrong with a record beyond the format of its file.

    Parameters
    ----------
    store : Store
        The data folder.
    record : LiquidRecord or PairRecord
        The record.

    Returns
    -------
    list of str
        Unknown sources, missing published files, missing components, undeserved grades.
    """
    found = []
    sources = store.stems("sources")
    for where, key in source_keys(record):
        if key not in sources:
            near = nearest(key, sources, 1)
            guess = f"; did you mean '{near[0]}'?" if near else ""
            found.append(f"{where}: there is no data/sources/{key}.toml{guess}")
    if isinstance(record, PairRecord):
        for key in record.components:
            if key not in store.stems("liquids"):
                found.append(f"components: there is no data/liquids/{key}.toml")
    for blocks in record.properties.values():
        for block in blocks:
            found.extend(grade_problems(block))
            for name in block.points:
                if not os.path.isfile(os.path.join(store.root, "published", f"{name}.csv")):
                    found.append(f"{block.label}: there is no data/published/{name}.csv")
    return list(dict.fromkeys(found))


class _Run:
    """One run of a command over a data folder."""

    def __init__(self, store: Store, *, write: bool) -> None:
        self.store, self.write = store, write
        self.bad: list[str] = []
        self.sealed = self.unchanged = 0

    def chosen(self, names: Sequence[str]) -> list[tuple[str, str]]:
        """The files that some names mean: keys, pairs ``a__b``, or ``liquids/key``."""
        files = [(f, stem) for f in FOLDERS for stem in sorted(self.store.stems(f))]
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
                self.bad.append(f"{name}: no such file in data/liquids or data/mixtures{guess}")
        return found

    def file(self, folder: str, stem: str) -> None:
        """Check one file, and seal it where that is the command and nothing is wrong."""
        name = f"{folder}/{stem}.toml"
        try:
            data = parse_file(self.store.root, name)
            read = read_liquid if folder == "liquids" else read_pair
            found = problems(self.store, read(stem, data))
        except RecordError as error:
            self.bad.append(str(error))
            return
        self.bad.extend(f"data/{folder}/{text.removeprefix(f'{folder}/')}" for text in found)
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
        """Compare the index with the files, and rewrite it where that is the command."""
        try:
            content = self.store.scan()
        except RecordError as error:
            self.bad.append(str(error))
            return
        path = Path(self.store.root, INDEX)
        text = json.dumps(content, indent=1, ensure_ascii=False, sort_keys=True) + "\n"
        if path.is_file() and path.read_text(encoding="utf-8") == text:
            return
        if self.write:
            _replace(path, text)
        else:
            self.bad.append(
                "data/index.json does not match the files; run: python -m dropkit.records seal"
            )


def _replace(path: Path, text: str) -> None:
    """Write a file in one step, so that nobody reads half of it."""
    handle, name = tempfile.mkstemp(dir=path.parent, suffix=".part")
    with os.fdopen(handle, "wb") as file:
        file.write(text.encode("utf-8"))
    os.replace(name, path)


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
