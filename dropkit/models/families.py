"""Finds models by listing folders, so that adding a file adds a model and edits nothing else."""

from __future__ import annotations

import importlib
import pkgutil
from collections.abc import Callable
from types import ModuleType
from typing import Any

__all__ = ["family_modules", "family_names", "lazy_family", "model_families"]


def model_families() -> tuple[str, ...]:
    """Names of the folders in ``dropkit.models``, each one physics.

    Returns
    -------
    tuple of str
        In alphabetical order.

    Examples
    --------
    >>> "jet" in model_families()
    True
    """
    import dropkit.models as package

    return tuple(sorted(info.name for info in pkgutil.iter_modules(package.__path__) if info.ispkg))


def family_modules(package: str) -> tuple[ModuleType, ...]:
    """The model files of one folder, imported.

    Parameters
    ----------
    package : str
        Full name, such as ``"dropkit.models.jet"``.

    Returns
    -------
    tuple of module
        In alphabetical order; files whose name starts with an underscore are left out.

    Examples
    --------
    >>> modules = family_modules("dropkit.models.jet")
    >>> "dropkit.models.jet.growth_inviscid" in [module.__name__ for module in modules]
    True
    """
    path = importlib.import_module(package).__path__
    names = sorted(info.name for info in pkgutil.iter_modules(path))
    return tuple(
        importlib.import_module(f"{package}.{name}") for name in names if not name.startswith("_")
    )


def family_names(package: str) -> dict[str, ModuleType]:
    """Every public name of one folder, with the file that holds it.

    Parameters
    ----------
    package : str
        Full name, such as ``"dropkit.models.jet"``.

    Returns
    -------
    dict of str to module
        What the files list in ``__all__``.

    Raises
    ------
    ImportError
        If two files list the same name.

    Examples
    --------
    >>> family_names("dropkit.models.jet")["drive_frequency"].__name__
    'dropkit.models.jet.drive_frequency_wavelength'
    """
    found: dict[str, ModuleType] = {}
    for module in family_modules(package):
        for name in module.__all__:
            if name in found:
                raise ImportError(f"{found[name].__name__} and {module.__name__} both hold {name}")
            found[name] = module
    return found


def lazy_family(package: str) -> tuple[Callable[[str], Any], Callable[[], list[str]]]:
    """``__getattr__`` and ``__dir__`` of a family's package: its names without any list.

    Parameters
    ----------
    package : str
        Full name of the package that asks.

    Returns
    -------
    (callable, callable)
        For ``__getattr__`` and ``__dir__``.

    Examples
    --------
    >>> fetch, names = lazy_family("dropkit.models.jet")
    >>> fetch("cut_off_wavelength").__name__
    'cut_off_wavelength'
    """

    def fetch(name: str) -> Any:
        if not name.startswith("_"):
            home = family_names(package).get(name)
            there = vars(importlib.import_module(package))
            if home is not None:
                there[name] = getattr(home, name)
            if name in there:  # also a file's own name, now that all were imported
                return there[name]
        raise AttributeError(f"module {package!r} has no attribute {name!r}")

    def names() -> list[str]:
        there = vars(importlib.import_module(package))
        return sorted({*there, *family_names(package)})

    return fetch, names
