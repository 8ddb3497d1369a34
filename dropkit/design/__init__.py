"""What composes liquids, numbers and models into tools: the design of a drop stream."""

from __future__ import annotations

import importlib
from typing import TYPE_CHECKING, Any

if TYPE_CHECKING:
    from dropkit.design.stream_design import stream
    from dropkit.design.stream_frames import streams
    from dropkit.design.stream_result import Stream

_HOMES = {
    "Stream": "dropkit.design.stream_result",
    "stream": "dropkit.design.stream_design",
    "streams": "dropkit.design.stream_frames",
}

__all__ = ["Stream", "stream", "streams"]


def __getattr__(name: str) -> Any:
    if name not in _HOMES:
        raise AttributeError(f"module 'dropkit.design' has no attribute {name!r}")
    value = getattr(importlib.import_module(_HOMES[name]), name)
    globals()[name] = value
    return value


def __dir__() -> list[str]:
    return sorted({*globals(), *__all__})
