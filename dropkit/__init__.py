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
    from dropkit.properties.choosing import choose
    from dropkit.properties.comparison import compare
    from dropkit.properties.frames import grid, lookup
    from dropkit.properties.gas import air
    from dropkit.properties.interfacial import interfacial_tension, liquid_pair, liquid_pairs
    from dropkit.properties.mixtures import mixture
    from dropkit.properties.own import fluid
    from dropkit.properties.pure import liquid
    from dropkit.properties.thickened_fluid import thickened
    from dropkit.properties.thickening import thickener
    from dropkit.provenance import cite

# Public name -> module that holds it; a name whose value is None is a module of its own.
_HOMES: dict[str, str | None] = {
    "air": "dropkit.properties.gas",
    "choose": "dropkit.properties.choosing",
    "cite": "dropkit.provenance",
    "compare": "dropkit.properties.comparison",
    "fluid": "dropkit.properties.own",
    "grid": "dropkit.properties.frames",
    "interfacial_tension": "dropkit.properties.interfacial",
    "liquid": "dropkit.properties.pure",
    "liquid_pair": "dropkit.properties.interfacial",
    "liquid_pairs": "dropkit.properties.interfacial",
    "liquids": "dropkit.properties.catalogue",
    "lookup": "dropkit.properties.frames",
    "mixture": "dropkit.properties.mixtures",
    "thickened": "dropkit.properties.thickened_fluid",
    "thickener": "dropkit.properties.thickening",
    "errors": None,
    "models": None,
    "numbers": None,
    "plots": None,
}

__all__ = [
    "air",
    "choose",
    "cite",
    "compare",
    "errors",
    "fluid",
    "grid",
    "interfacial_tension",
    "liquid",
    "liquid_pair",
    "liquid_pairs",
    "liquids",
    "lookup",
    "mixture",
    "models",
    "numbers",
    "plots",
    "thickened",
    "thickener",
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
