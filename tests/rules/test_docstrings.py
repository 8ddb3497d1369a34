"""Public callables say what they take, give and raise, and show an example that runs."""

from __future__ import annotations

import ast
import doctest
import importlib
import inspect
import pkgutil
import re
import textwrap
from typing import Any

import pytest
from numpydoc.docscrape import NumpyDocString

import dropkit as dk

# What these packages list is public; of the other layers what `dropkit` itself lists.
OPEN_LAYERS = ("numbers", "models", "design", "plots")


def is_open(module: str) -> bool:
    """Whether the names that a module lists are public."""
    parts = module.split(".")
    if parts[1] == "models":  # families list nothing themselves: their files are their contents
        return len(parts) == 4 or parts[-1] == "catalogue"
    return len(parts) == 2 and parts[1] in OPEN_LAYERS


def modules(prefix: str = "dropkit.") -> list[str]:
    """Names of all modules of the package."""
    return [info.name for info in pkgutil.walk_packages(dk.__path__, prefix)]


def plain(thing: Any) -> Any:
    """The function under a boundary or other wrapper."""
    return inspect.unwrap(thing)


def public() -> dict[str, Any]:
    """Every public function, boundary and class, by its full name where it is defined."""
    found: dict[str, Any] = {}
    candidates = [(f"dropkit.{name}", getattr(dk, name)) for name in dk.__all__]
    for module in modules():
        loaded = importlib.import_module(module)
        if is_open(module):
            candidates += [
                (f"{module}.{n}", getattr(loaded, n)) for n in getattr(loaded, "__all__", [])
            ]
    for _, thing in candidates:
        if callable(thing):
            core = plain(thing)
            found[f"{core.__module__}.{core.__qualname__}"] = thing
    return dict(sorted(found.items()))


PUBLIC = public()
FUNCTIONS = {name: thing for name, thing in PUBLIC.items() if not inspect.isclass(thing)}


def sections(thing: Any) -> NumpyDocString:
    """The parsed docstring of a callable."""
    return NumpyDocString(inspect.getdoc(thing) or "")


def documented(doc: NumpyDocString) -> list[str]:
    """Names of the documented parameters, `a, b : float` counted as two, stars dropped."""
    names: list[str] = []
    for heading in ("Parameters", "Other Parameters"):
        for entry in doc[heading]:
            names += [part.strip().lstrip("*") for part in entry.name.split(",")]
    return names


def raises_something(function: Any) -> bool:
    """Whether the body of a function has a raise statement of its own."""
    tree = ast.parse(textwrap.dedent(inspect.getsource(function)))
    return any(isinstance(node, ast.Raise) for node in ast.walk(tree))


@pytest.mark.parametrize("name", PUBLIC)
def test_has_a_summary_of_one_line(name: str) -> None:
    doc = inspect.getdoc(PUBLIC[name])
    assert doc, f"{name} has no docstring"
    first, *rest = doc.splitlines()
    assert first.rstrip().endswith((".", "?")), (
        f"{name}: the summary is not one sentence on one line"
    )
    assert not rest or not rest[0].strip()


@pytest.mark.parametrize("name", PUBLIC)
def test_parameters_agree_with_the_signature(name: str) -> None:
    thing = PUBLIC[name]
    if inspect.isclass(thing) and issubclass(thing, Exception):
        return
    signature = inspect.signature(plain(thing))
    expected = [parameter for parameter in signature.parameters if parameter != "self"]
    assert documented(sections(thing)) == expected
    for heading in ("Parameters", "Other Parameters"):
        for entry in sections(thing)[heading]:
            assert entry.type or entry.name.startswith("*"), f"{name}: {entry.name} has no type"
            assert "".join(entry.desc).strip(), f"{name}: nothing is said of {entry.name}"


@pytest.mark.parametrize("name", FUNCTIONS)
def test_returns_are_described(name: str) -> None:
    annotation = inspect.signature(plain(FUNCTIONS[name])).return_annotation
    if annotation not in (None, "None"):
        doc = sections(FUNCTIONS[name])
        assert doc["Returns"] or doc["Yields"], f"{name}: no Returns section"


@pytest.mark.parametrize("name", FUNCTIONS)
def test_raises_are_listed_where_it_raises(name: str) -> None:
    if raises_something(plain(FUNCTIONS[name])):
        assert sections(FUNCTIONS[name])["Raises"], f"{name}: no Raises section"


@pytest.mark.parametrize("name", FUNCTIONS)
def test_has_an_example(name: str) -> None:
    examples = "\n".join(sections(FUNCTIONS[name])["Examples"])
    assert doctest.DocTestParser().get_examples(examples), f"{name}: no example that runs"


# Physical arguments say their unit in square brackets; a pure number says [-].
@pytest.mark.parametrize(
    "name", [name for name in FUNCTIONS if ".numbers." in name or ".models." in name]
)
def test_physical_arguments_state_their_unit(name: str) -> None:
    from dropkit.unit_table import NOMENCLATURE

    for entry in sections(FUNCTIONS[name])["Parameters"]:
        for word in entry.name.split(","):
            if word.strip() in NOMENCLATURE:
                text = f"{entry.type} {' '.join(entry.desc)}"
                assert re.search(r"\[[^\]]+\]", text), f"{name}: unit of {word.strip()}"


@pytest.mark.parametrize("module", modules())
def test_every_module_says_what_it_holds(module: str) -> None:
    loaded = importlib.import_module(module)
    assert (loaded.__doc__ or "").strip(), f"{module} has no docstring"
    is_package = hasattr(loaded, "__path__")
    is_private = module.rpartition(".")[2].startswith("_")
    assert hasattr(loaded, "__all__") or is_package or is_private, f"{module} has no __all__"


def test_examples_of_boundaries_are_collected_as_doctests() -> None:
    # A boundary is an object, not a function: doctest finds it only if it looks like one.
    weber = dk.numbers.weber
    home = importlib.import_module(plain(weber).__module__)
    found = {test.name for test in doctest.DocTestFinder().find(home) if test.examples}
    assert any(name.endswith(".weber") for name in found), sorted(found)
