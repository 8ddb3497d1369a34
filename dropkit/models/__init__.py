"""Published models: one folder per physics, one published model per file.

Each file states source, range, how its formula was seen and how well it agrees with measured
points; `dropkit.models.catalogue.published_models` lists them all from the folders.
"""

from __future__ import annotations

import importlib
from collections.abc import Callable
from typing import Any


def _lazy() -> tuple[Callable[[str], Any], Callable[[], list[str]]]:
    def fetch(name: str) -> Any:
        if not name.startswith("_"):
            from dropkit.models.families import model_families

            if name in (*model_families(), "catalogue"):
                return importlib.import_module(f"dropkit.models.{name}")
        raise AttributeError(f"module 'dropkit.models' has no attribute {name!r}")

    def names() -> list[str]:
        from dropkit.models.families import model_families

        return sorted({*globals(), *model_families(), "catalogue"})

    return fetch, names


__getattr__, __dir__ = _lazy()
