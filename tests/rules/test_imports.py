"""Imports run one way, cost nothing, and every public name is where it says it is."""

from __future__ import annotations

import ast
import importlib
import subprocess
import sys
from collections.abc import Iterator
from pathlib import Path

import pytest

import dropkit

PACKAGE = Path(dropkit.__file__).parent
LAYERS = ["base", "properties", "numbers", "models", "design", "plots"]

# (importing module, imported module or the package it lies in, why). Nothing else is excused.
EXCEPTIONS = [
    (
        "properties.state",
        "numbers.sheet",
        "State.numbers() is the way from a condition to its numbers; imported when it is called",
    ),
]

# Who alone may import what.
ONLY = {
    "pint": {"units"},
    "CoolProp": {"properties.engines"},
    "thermo": {"properties.engines"},
    "chemicals": {"properties.engines"},
    "fluids": {"properties.engines"},
    "matplotlib": {"plots"},
}
# Never needed: no compiled helper is in use, and nothing here talks to a network.
NEVER = {"numba", "urllib", "requests", "socket", "http"}

# Past this a file asks for a split by physics: it no longer fits in one reading.
LONGEST = 450
LONG_FILES: dict[str, str] = {}

HEAVY = ["pandas", "pint", "CoolProp", "thermo", "chemicals", "scipy", "matplotlib", "numba"]


def module_name(path: Path) -> str:
    """'properties.state' for properties/state.py, '' for the package itself."""
    parts = path.relative_to(PACKAGE).with_suffix("").parts
    return ".".join(parts[:-1] if parts[-1] == "__init__" else parts)


FILES = {
    module_name(path): path
    for path in sorted(PACKAGE.rglob("*.py"))
    if "data" not in path.relative_to(PACKAGE).parts
}
TREES = {name: ast.parse(path.read_text(encoding="utf-8")) for name, path in FILES.items()}


def imported(name: str, node: ast.AST) -> Iterator[str]:
    """Absolute names of the modules that one import statement may load."""
    if isinstance(node, ast.Import):
        yield from (alias.name for alias in node.names)
    elif isinstance(node, ast.ImportFrom):
        base = node.module or ""
        if node.level:
            package = name if FILES[name].name == "__init__.py" else name.rpartition(".")[0]
            parts = ["dropkit", *filter(None, package.split("."))]
            base = ".".join([*parts[: len(parts) - node.level + 1], base]).rstrip(".")
        for alias in node.names:
            whole = f"{base}.{alias.name}"
            is_module = whole.removeprefix("dropkit.") in FILES
            yield whole if is_module else base


def imports_of(name: str) -> Iterator[tuple[str, int]]:
    """Every module that a module imports, anywhere in its text, with the line."""
    for node in ast.walk(TREES[name]):
        for target in imported(name, node):
            yield target, getattr(node, "lineno", 0)


def own(target: str) -> str | None:
    """The name inside dropkit, or None for an outside module."""
    if target == "dropkit":
        return ""
    return target.removeprefix("dropkit.") if target.startswith("dropkit.") else None


def layer(name: str) -> str:
    """The layer that a module of dropkit belongs to; a file beside the folders is base."""
    top = name.partition(".")[0]
    return "base" if (PACKAGE / f"{top}.py").is_file() else top


def within(name: str, package: str) -> bool:
    """Whether a module is, or lies in, a package."""
    return name == package or name.startswith(package + ".")


def excused(name: str, target: str) -> bool:
    """Whether an import stands on the list of exceptions."""
    return any(name == who and within(target, what) for who, what, _ in EXCEPTIONS)


def family(name: str) -> str | None:
    """'jet' for models.jet.wavelength; None outside the families."""
    parts = name.split(".")
    if parts[0] != "models" or len(parts) < 2:
        return None
    return parts[1] if (PACKAGE / "models" / parts[1]).is_dir() else None


@pytest.mark.parametrize("name", sorted(FILES))
def test_every_module_belongs_to_a_layer(name: str) -> None:
    assert name == "" or layer(name) in LAYERS


@pytest.mark.parametrize("name", [name for name in sorted(FILES) if name])
def test_imports_run_one_way(name: str) -> None:
    wrong = []
    for target, line in imports_of(name):
        inside = own(target)
        if inside is None or excused(name, inside):
            continue
        if inside == "":
            wrong.append(f"line {line}: imports dropkit itself; name the module")
        elif LAYERS.index(layer(inside)) > LAYERS.index(layer(name)):
            wrong.append(f"line {line}: {layer(name)} imports {inside}")
        elif family(name) and family(inside) and family(name) != family(inside):
            wrong.append(f"line {line}: family {family(name)} imports {inside}; design composes")
    assert not wrong, "\n".join([f"{FILES[name]}:", *wrong])


def test_each_exception_is_used_and_late() -> None:
    for who, what, why in EXCEPTIONS:
        assert why
        at_top = [t for node in TREES[who].body for t in imported(who, node)]
        anywhere = [own(target) or "" for target, _ in imports_of(who)]
        assert any(within(target, what) for target in anywhere), f"{who} no longer needs {what}"
        assert not any(within(own(t) or "", what) for t in at_top), f"{who}: import {what} late"


@pytest.mark.parametrize("name", sorted(FILES))
def test_outside_packages_are_imported_where_they_belong(name: str) -> None:
    for target, line in imports_of(name):
        top = target.partition(".")[0]
        assert top not in NEVER, f"{FILES[name]}:{line} imports {target}"
        if top in ONLY:
            assert any(within(name, place) for place in ONLY[top]), (
                f"{FILES[name]}:{line} imports {target}; only {', '.join(ONLY[top])} may"
            )


def test_no_cycle_among_module_level_imports() -> None:
    graph: dict[str, set[str]] = {}
    for name in FILES:
        found = set()
        for node in TREES[name].body:  # the top level only: what runs when it is imported
            found |= {inside for t in imported(name, node) if (inside := own(t)) in FILES}
        graph[name] = {target for target in found if target not in ("", name)}
    done: set[str] = set()

    def visit(name: str, path: tuple[str, ...]) -> None:
        assert name not in path, " -> ".join([*path, name])
        if name not in done:
            for target in sorted(graph[name]):
                visit(target, (*path, name))
            done.add(name)

    for name in FILES:
        visit(name, ())
    assert done == set(FILES)


def lazy_homes(name: str) -> dict[str, str | None] | None:
    """The table of lazily loaded names of a package, where it has one."""
    return getattr(importlib.import_module(f"dropkit.{name}".rstrip(".")), "_HOMES", None)


PACKAGES = [name for name, path in sorted(FILES.items()) if path.name == "__init__.py"]
LAZY = [name for name in PACKAGES if "def __getattr__" in FILES[name].read_text(encoding="utf-8")]


@pytest.mark.parametrize("name", LAZY)
def test_lazy_names_agree_with_all_and_type_checking(name: str) -> None:
    package = f"dropkit.{name}".rstrip(".")
    module = importlib.import_module(package)
    homes = lazy_homes(name)
    assert homes is not None
    typed: dict[str, str] = {}
    for node in TREES[name].body:
        if isinstance(node, ast.If) and "TYPE_CHECKING" in ast.dump(node.test):
            for statement in ast.walk(node):
                if isinstance(statement, ast.ImportFrom):
                    typed |= {a.asname or a.name: statement.module or "" for a in statement.names}
    expected = {key: package if home is None else home for key, home in homes.items()}
    assert typed == expected
    assert sorted(module.__all__) == sorted(homes)
    assert set(homes) <= set(dir(module))
    for key, home in homes.items():
        assert getattr(module, key) is not None
        if home is not None:
            source = importlib.import_module(home)
            assert getattr(module, key) is getattr(source, key)
            assert key in source.__all__, f"{home}.__all__ lacks {key}"


def public_callables() -> dict[str, str]:
    """Every name in an __all__ that can be called -> the module that lists it."""
    found = {}
    for name in FILES:
        module = importlib.import_module(f"dropkit.{name}".rstrip("."))
        for key in getattr(module, "__all__", []):
            if callable(getattr(module, key)):
                found.setdefault(key, module.__name__)
    return found


def test_no_module_shares_a_callables_name() -> None:
    # A lazy `numbers.weber` would be the function at first and the module `weber` ever after.
    modules = {name.rpartition(".")[2]: name for name in FILES if name}
    shared = {
        key: (where, modules[key]) for key, where in public_callables().items() if key in modules
    }
    assert not shared


def test_files_stay_readable() -> None:
    lengths = {
        name: len(path.read_text(encoding="utf-8").splitlines()) for name, path in FILES.items()
    }
    long = {name: n for name, n in lengths.items() if n > LONGEST and name not in LONG_FILES}
    assert not long, f"past {LONGEST} lines: {long}; split by physics"
    assert all(lengths[name] > LONGEST for name in LONG_FILES), "an exception is no longer needed"


WATCH = """
import sys
opened = []
sys.addaudithook(lambda event, args: opened.append(str(args[0])) if event == "open" else None)
{code}
data = [name for name in opened if name.endswith((".toml", ".json", ".csv", ".txt"))]
loaded = [name for name in {heavy} if name in sys.modules]
print(repr((loaded, data)))
"""


def watch(code: str) -> tuple[list[str], list[str]]:
    """Heavy packages loaded and data files opened by some code in a new interpreter."""
    script = WATCH.format(code=code, heavy=HEAVY)
    run = subprocess.run(
        [sys.executable, "-c", script], capture_output=True, text=True, check=False
    )
    assert run.returncode == 0, run.stderr
    return ast.literal_eval(run.stdout.splitlines()[-1])


def test_import_dropkit_loads_nothing_heavy_and_reads_nothing() -> None:
    assert watch("import dropkit; dir(dropkit)") == ([], [])


def test_no_module_reads_data_or_loads_an_engine_when_imported() -> None:
    # Modules may import scipy or pandas only inside functions: no answer needs them at import.
    # In one interpreter; with each module, what was there once it had been imported.
    names = [name for name in FILES if name]
    steps = "\n".join(
        f"import dropkit.{name}; seen.setdefault(state(), {name!r})" for name in names
    )
    script = f"""
import sys
opened, seen = [], {{}}
sys.addaudithook(lambda event, args: opened.append(str(args[0])) if event == "open" else None)
def state():
    data = [name for name in opened if name.endswith((".toml", ".json", ".csv"))]
    return (tuple(name for name in {HEAVY} if name in sys.modules), tuple(data))
{steps}
print(repr({{culprit: found for found, culprit in seen.items()}}))
"""
    run = subprocess.run(
        [sys.executable, "-c", script], capture_output=True, text=True, check=False
    )
    assert run.returncode == 0, run.stderr
    assert ast.literal_eval(run.stdout) == {names[0]: ((), ())}


def test_an_si_lookup_loads_nothing_heavy_and_one_liquids_record() -> None:
    loaded, data = watch("import dropkit as dk; dk.liquid('water').viscosity(305.15)")
    assert loaded == []
    records = {Path(name).name for name in data if "liquids" in Path(name).parts}
    assert records == {"water.toml"}


def test_a_unit_string_loads_no_engine() -> None:
    loaded, _ = watch("import dropkit as dk; dk.liquid('water').viscosity('32 degC')")
    # pint looks for scipy by importing it; pandas, engines and plots stay out.
    assert set(loaded) <= {"pint", "scipy"}
