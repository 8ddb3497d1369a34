"""Words that must not appear: where it was made, verdicts on hazards, unfinished business."""

from __future__ import annotations

import ast
import re
from pathlib import Path

import pytest

ROOT = Path(__file__).parents[2]
TEXT = {".py", ".md", ".toml", ".csv", ".json", ".cfg", ".txt", ".sh", ""}


def is_made(part: str) -> bool:
    """Whether a folder is made by tools, such as .venv, dist or a cache, and no part of the source."""
    return (part.startswith(".") and part != ".ci") or part in ("__pycache__", "dist")


FILES = [
    path
    for path in sorted(ROOT.rglob("*"))
    if path.is_file()
    and path.suffix in TEXT
    and not any(map(is_made, path.relative_to(ROOT).parts[:-1]))
]

# Written in pieces, or this file would find itself.
MACHINE_PATHS = re.compile(
    r"(?<![\w.<$}/])/(?:" + "|".join(["wor" + "k", "tm" + "p", "roo" + "t", "hom" + "e"]) + r")/"
)
HOSTS = re.compile(
    "|".join(["pyp" + r"i\.org", "pythonhosted" + r"\.org", "npmjs" + r"\.", "crates" + r"\.io"])
)
UNFINISHED = re.compile(
    r"\b(?:" + "|".join(["TO" + "DO", "FIX" + "ME", "XX" + "X", "TB" + "D"]) + r")\b"
)


def text(path: Path) -> str:
    """A file's text; empty for one that is none."""
    try:
        return path.read_text(encoding="utf-8")
    except UnicodeDecodeError:
        return ""


def hits(pattern: re.Pattern[str], files: list[Path]) -> list[str]:
    """Where a pattern occurs, as file:line: text."""
    return [
        f"{path.relative_to(ROOT)}:{number}: {line.strip()[:100]}"
        for path in files
        for number, line in enumerate(text(path).splitlines(), 1)
        if pattern.search(line)
    ]


def test_there_is_something_to_read() -> None:
    names = {path.relative_to(ROOT).as_posix() for path in FILES}
    assert {"README.md", "pyproject.toml", ".ci/run", "dropkit/errors.py"} <= names


def test_no_paths_of_the_machine_where_it_was_made() -> None:
    assert hits(MACHINE_PATHS, FILES) == []


def test_no_registry_hosts() -> None:
    assert hits(HOSTS, FILES) == []


def test_nothing_is_left_unfinished() -> None:
    assert hits(UNFINISHED, FILES) == []


def spoken(path: Path) -> list[tuple[int, str]]:
    """The string literals of a module that can reach a user: all but docstrings."""
    tree = ast.parse(text(path))
    documented = (ast.Module, ast.ClassDef, ast.FunctionDef, ast.AsyncFunctionDef)
    docstrings = {
        id(node.body[0].value)
        for node in ast.walk(tree)
        if isinstance(node, documented) and node.body and isinstance(node.body[0], ast.Expr)
    }
    return [
        (node.lineno, node.value)
        for node in ast.walk(tree)
        if isinstance(node, ast.Constant)
        and isinstance(node.value, str)
        and id(node) not in docstrings
    ]


# The library states facts and defers to the safety data sheet; it never passes a verdict.
VERDICT = re.compile(
    r"\b(?:safe|safely|harmless|non-hazardous|risk-free|guaranteed)\b", re.IGNORECASE
)
# "water does not make it non-flammable" denies a verdict; the word by itself would be one.
FIREPROOF = re.compile(
    r"(?<!does not make it )\b(?:non-flammable|nonflammable|fireproof)\b", re.IGNORECASE
)


@pytest.mark.parametrize("pattern", [VERDICT, FIREPROOF], ids=["verdict", "fire"])
def test_the_library_never_says_that_something_is_harmless(pattern: re.Pattern[str]) -> None:
    modules = [
        path for path in FILES if path.suffix == ".py" and path.is_relative_to(ROOT / "dropkit")
    ]
    spoken_hits = [
        f"{path.relative_to(ROOT)}:{line}: {words}"
        for path in modules
        for line, words in spoken(path)
        if pattern.search(words)
    ]
    data = ROOT / "data"
    records = [path for path in FILES if path.suffix == ".toml" and path.is_relative_to(data)]
    # A citation may have any title.
    records = [path for path in records if "sources" not in path.parts]
    assert spoken_hits + hits(pattern, records) == []
