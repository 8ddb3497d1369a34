"""Pictures of properties; matplotlib is loaded when one is drawn.

Every function takes an Axes (or makes one) and returns it, so pictures compose.
"""

from __future__ import annotations

import importlib
from typing import TYPE_CHECKING, Any

if TYPE_CHECKING:
    from dropkit.plots.compositions import property_over_composition
    from dropkit.plots.temperatures import property_over_temperature

__all__ = ["property_over_composition", "property_over_temperature"]

_HOMES = {
    "property_over_composition": "dropkit.plots.compositions",
    "property_over_temperature": "dropkit.plots.temperatures",
}


def __getattr__(name: str) -> Any:
    if name not in _HOMES:
        raise AttributeError(f"module 'dropkit.plots' has no attribute {name!r}")
    value = getattr(importlib.import_module(_HOMES[name]), name)
    globals()[name] = value
    return value


def __dir__() -> list[str]:
    return sorted({*globals(), *__all__})
