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
# Methods that users call often show how.
OFTEN = {
    "at", "find", "fractions", "grade", "numbers", "range", "si", "surface_tension", "table",
    "to_dict", "trail", "uncertainty", "viscosity", "with_units", "with_values",
}  # fmt: skip


def own_classes() -> dict[str, list[type]]:
    """Every class of the package, by its bare name."""
    found: dict[str, list[type]] = {}
    for module in modules():
        for name, thing in vars(importlib.import_module(module)).items():
            if inspect.isclass(thing) and thing.__module__ == module:
                found.setdefault(name, []).append(thing)
    return found


OWN_CLASSES = own_classes()


def named_in(annotation: Any, module: str) -> list[type]:
    """Classes of the package that an annotation names, seen from the module that it stands in."""
    found = []
    for word in set(re.findall(r"\w+", str(annotation))):
        here = getattr(importlib.import_module(module), word, None)
        if inspect.isclass(here):
            found += [here] if here.__module__.startswith("dropkit.") else []
        elif word in OWN_CLASSES:  # imported for the type checker only
            (only,) = OWN_CLASSES[word]
            found.append(only)
    return found


def functions_of(cls: type) -> dict[str, Any]:
    """The functions behind the public methods and properties that a class itself defines."""
    found = {}
    for name, thing in vars(cls).items():
        function = thing.fget if isinstance(thing, property) else getattr(thing, "__func__", thing)
        if inspect.isfunction(function) and not name.startswith("_"):
            found[name] = function
    return found


def leads_to(cls: type) -> list[type]:
    """Its bases, and what its methods, properties, fields and arguments are said to be."""
    functions = functions_of(cls).values()
    annotations = [inspect.signature(function).return_annotation for function in functions]
    annotations += [p.annotation for p in inspect.signature(cls).parameters.values()]
    annotations += [a for n, a in inspect.get_annotations(cls).items() if not n.startswith("_")]
    named = [found for text in annotations for found in named_in(text, cls.__module__)]
    return [base for base in cls.__mro__[1:] if base.__module__.startswith("dropkit.")] + named


def reachable() -> dict[str, type]:
    """Every class that is public or that a user holds after calling what is public."""
    queue = [thing for thing in PUBLIC.values() if inspect.isclass(thing)]
    for function in FUNCTIONS.values():
        core = plain(function)
        queue += named_in(inspect.signature(core).return_annotation, core.__module__)
        kind = type(function)  # a boundary is an object of a class of the package
        queue += [kind] if kind.__module__.startswith("dropkit.") else []
    found: dict[str, type] = {}
    while queue:
        cls = queue.pop()
        name = f"{cls.__module__}.{cls.__qualname__}"
        # Nobody makes or holds a protocol: it only describes.
        if name not in found and not getattr(cls, "_is_protocol", False):
            found[name] = cls
            queue += leads_to(cls)
    return dict(sorted(found.items()))


CLASSES = reachable()
ATTRIBUTES = {
    f"{where}.{name}": function
    for where, cls in CLASSES.items()
    for name, function in functions_of(cls).items()
}
METHODS = {
    f"{where}.{name}": ATTRIBUTES[f"{where}.{name}"]
    for where, cls in CLASSES.items()
    for name in functions_of(cls)
    if not isinstance(vars(cls)[name], property)
}
SHOWN = {
    **FUNCTIONS,
    **{name: thing for name, thing in METHODS.items() if name.rpartition(".")[2] in OFTEN},
}


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
    raised = [node.exc for node in ast.walk(tree) if isinstance(node, ast.Raise)]
    # A method that every heir overrides raises for nobody.
    return any(getattr(what, "id", "") != "NotImplementedError" for what in raised)


@pytest.mark.parametrize("name", {**PUBLIC, **CLASSES, **ATTRIBUTES})
def test_has_a_summary_of_one_line(name: str) -> None:
    doc = inspect.getdoc({**PUBLIC, **CLASSES, **ATTRIBUTES}[name])
    assert doc, f"{name} has no docstring"
    first, *rest = doc.splitlines()
    assert first.rstrip().endswith((".", "?")), (
        f"{name}: the summary is not one sentence on one line"
    )
    assert not rest or not rest[0].strip()


@pytest.mark.parametrize("name", {**PUBLIC, **CLASSES, **METHODS})
def test_parameters_agree_with_the_signature(name: str) -> None:
    thing = {**PUBLIC, **CLASSES, **METHODS}[name]
    if inspect.isclass(thing) and issubclass(thing, Exception):
        return
    signature = inspect.signature(plain(thing))
    expected = [parameter for parameter in signature.parameters if parameter not in ("self", "cls")]
    assert documented(sections(thing)) == expected
    for heading in ("Parameters", "Other Parameters"):
        for entry in sections(thing)[heading]:
            assert entry.type or entry.name.startswith("*"), f"{name}: {entry.name} has no type"
            assert "".join(entry.desc).strip(), f"{name}: nothing is said of {entry.name}"


@pytest.mark.parametrize("name", {**FUNCTIONS, **METHODS})
def test_returns_are_described(name: str) -> None:
    function = {**FUNCTIONS, **METHODS}[name]
    if inspect.signature(plain(function)).return_annotation not in (None, "None"):
        doc = sections(function)
        assert doc["Returns"] or doc["Yields"], f"{name}: no Returns section"


@pytest.mark.parametrize("name", {**FUNCTIONS, **METHODS})
def test_raises_are_listed_where_it_raises(name: str) -> None:
    function = {**FUNCTIONS, **METHODS}[name]
    if raises_something(plain(function)):
        assert sections(function)["Raises"], f"{name}: no Raises section"


@pytest.mark.parametrize("name", SHOWN)
def test_has_an_example(name: str) -> None:
    examples = "\n".join(sections(SHOWN[name])["Examples"])
    assert doctest.DocTestParser().get_examples(examples), f"{name}: no example that runs"


# Physical arguments say their unit in square brackets; a pure number says [-].
@pytest.mark.parametrize(
    "name", [*(name for name in FUNCTIONS if ".numbers." in name or ".models." in name), *METHODS]
)
def test_physical_arguments_state_their_unit(name: str) -> None:
    from dropkit.unit_table import NOMENCLATURE

    for entry in sections({**FUNCTIONS, **METHODS}[name])["Parameters"]:
        for word in entry.name.split(","):
            if word.strip() in NOMENCLATURE:
                text = f"{entry.type} {' '.join(entry.desc)}"
                assert re.search(r"\[[^\]]+\]", text), f"{name}: unit of {word.strip()}"


def test_the_classes_that_users_hold_are_found() -> None:
    # The rules above hold for what is found: none of these may slip away from them.
    held = {cls.__name__ for cls in CLASSES.values()}
    liquids = {"Fluid", "Liquid", "Mixture", "OwnFluid", "PropertyMethods"}
    assert held >= {
        *liquids,
        "Air",
        "State",
        "Found",
        "NumbersSheet",
        "NumberRow",
        "Trail",
        "Range",
    }
    assert {name.rpartition(".")[2] for name in METHODS} >= OFTEN


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
