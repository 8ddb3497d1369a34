"""The tests' own rules: they check something, and nothing that a busy machine could change."""

from __future__ import annotations

import ast
from collections import Counter
from pathlib import Path

TESTS = Path(__file__).parents[1]
FILES = [path for path in sorted(TESTS.rglob("*.py")) if "__pycache__" not in path.parts]
TREES = {path: ast.parse(path.read_text(encoding="utf-8")) for path in FILES}


def called(tree: ast.AST) -> set[str]:
    """Last part of the name of everything that is called."""
    names = set()
    for node in ast.walk(tree):
        if isinstance(node, ast.Call):
            function = node.func
            names.add(getattr(function, "attr", getattr(function, "id", "")))
    return names


def test_file_names_are_used_once_and_folders_are_no_packages() -> None:
    # Modules of tests are imported by their bare names.
    twice = [name for name, n in Counter(path.name for path in FILES).items() if n > 1]
    assert not twice
    assert not list(TESTS.rglob("__init__.py"))


def test_no_test_sleeps_or_uses_the_network() -> None:
    network = {"socket", "requests", "urllib", "http", "ftplib"}
    for path, tree in TREES.items():
        assert "sleep" not in called(tree), path
        for node in ast.walk(tree):
            if isinstance(node, ast.Import):
                assert not network & {alias.name.partition(".")[0] for alias in node.names}, path
            elif isinstance(node, ast.ImportFrom):
                assert (node.module or "").partition(".")[0] not in network, path


def test_only_the_benches_look_at_a_clock() -> None:
    clocks = {"perf_counter", "perf_counter_ns", "monotonic", "process_time", "timeit"}
    for path, tree in TREES.items():
        if path.is_relative_to(TESTS / "bench") or path == Path(__file__):
            continue
        names = {node.id for node in ast.walk(tree) if isinstance(node, ast.Name)}
        attributes = {node.attr for node in ast.walk(tree) if isinstance(node, ast.Attribute)}
        assert not clocks & (names | attributes), path


def test_every_test_asserts_something() -> None:
    idle = []
    for path, tree in TREES.items():
        # A function of the same file that asserts, or hands on to one that does, may do it.
        functions = [n for n in ast.walk(tree) if isinstance(n, ast.FunctionDef)]
        asserts = {"raises", "warns", "fail", "assert_allclose", "assert_array_equal"}
        asserts |= {"assert_series_equal", "assert_frame_equal", "assert_index_equal"}
        grown = True
        while grown:
            before = len(asserts)
            for function in functions:
                has = any(isinstance(node, ast.Assert) for node in ast.walk(function))
                if has or called(function) & asserts:
                    asserts.add(function.name)
            grown = len(asserts) > before
        idle += [
            f"{path.relative_to(TESTS)}: {function.name}"
            for function in functions
            if function.name.startswith("test_") and function.name not in asserts
        ]
    assert not idle
