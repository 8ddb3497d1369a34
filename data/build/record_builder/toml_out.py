"""Writing the few TOML shapes that records and reports need."""

from __future__ import annotations

import json
import math
from collections.abc import Mapping
from typing import Any

__all__ = ["dumps"]

_WIDTH = 100


def _scalar(value: Any) -> str:
    if isinstance(value, bool):
        return "true" if value else "false"
    if isinstance(value, str):
        return json.dumps(value, ensure_ascii=False)
    if isinstance(value, int):
        return str(value)
    if isinstance(value, float):
        if not math.isfinite(value):
            raise ValueError(f"{value} has no place in a record")
        return repr(value)
    if isinstance(value, Mapping):
        inside = ", ".join(f"{_key(k)} = {_scalar(v)}" for k, v in value.items())
        return f"{{ {inside} }}"
    if isinstance(value, (list, tuple)):
        return _list(list(value))
    if hasattr(value, "item"):  # a numpy scalar
        return _scalar(value.item())
    raise TypeError(f"cannot write {value!r}")


def _list(values: list[Any]) -> str:
    items = [_scalar(value) for value in values]
    line = f"[{', '.join(items)}]"
    if len(line) <= _WIDTH - 20 or len(items) < 2:
        return line
    return "[\n" + "".join(f"    {item},\n" for item in items) + "]"


def _key(key: str) -> str:
    plain = key.replace("_", "").replace("-", "")
    return key if plain.isascii() and plain.isalnum() else json.dumps(key, ensure_ascii=False)


def _table(data: Mapping[str, Any], path: str, lines: list[str]) -> None:
    later: list[tuple[str, Any]] = []
    for key, value in data.items():
        tables = isinstance(value, list) and value and all(isinstance(v, Mapping) for v in value)
        # Short tables below the top level read better inline (second, left_out, checks).
        if not path and (isinstance(value, Mapping) or tables):
            later.append((key, value))
        elif value == [] and path:
            continue  # what a block may leave out
        else:
            lines.append(f"{_key(key)} = {_scalar(value)}")
    for key, value in later:
        if isinstance(value, Mapping):
            lines.extend(["", f"[{_key(key)}]"])
            _table(value, key, lines)
        else:
            for entry in value:
                lines.extend(["", f"[[{_key(key)}]]"])
                _table(entry, key, lines)


def dumps(data: Mapping[str, Any], header: str = "") -> str:
    """TOML text: plain keys first, then tables and lists of tables in their order."""
    lines = [f"# {line}" for line in header.splitlines()]
    _table(data, "", lines)
    return "\n".join(lines) + "\n"
