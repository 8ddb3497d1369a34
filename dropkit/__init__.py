"""dropkit: fluid properties, numbers, models and design tools for turning liquids into drops."""

from __future__ import annotations

import importlib
import sys
from typing import TYPE_CHECKING, Any

from dropkit.version import VERSION

__version__ = VERSION

if TYPE_CHECKING:
    from dropkit import errors, models, numbers, plots
    from dropkit.properties.catalogue import liquids
    from dropkit.properties.comparison import compare
    from dropkit.properties.frames import grid, lookup
    from dropkit.properties.gas import air
    from dropkit.properties.mixtures import mixture
    from dropkit.properties.own import fluid
    from dropkit.properties.pure import liquid
    from dropkit.provenance import cite

# Public name -> module that holds it; a name whose value is None is a module of its own.
_HOMES: dict[str, str | None] = {
    "air": "dropkit.properties.gas",
    "cite": "dropkit.provenance",
    "compare": "dropkit.properties.comparison",
    "fluid": "dropkit.properties.own",
    "grid": "dropkit.properties.frames",
    "liquid": "dropkit.properties.pure",
    "liquids": "dropkit.properties.catalogue",
    "lookup": "dropkit.properties.frames",
    "mixture": "dropkit.properties.mixtures",
    "errors": None,
    "models": None,
    "numbers": None,
    "plots": None,
}

__all__ = [
    "air",
    "cite",
    "compare",
    "errors",
    "fluid",
    "grid",
    "liquid",
    "liquids",
    "lookup",
    "mixture",
    "models",
    "numbers",
    "plots",
]


def __getattr__(name: str) -> Any:
    if name not in _HOMES:
        # With name and obj Python itself suggests the nearest.
        module = sys.modules[__name__]
        raise AttributeError(f"module 'dropkit' has no attribute {name!r}", name=name, obj=module)
    home = _HOMES[name]
    if home is None:
        return importlib.import_module(f"dropkit.{name}")
    value = getattr(importlib.import_module(home), name)
    globals()[name] = value
    return value


def __dir__() -> list[str]:
    return sorted({*globals(), *__all__})
