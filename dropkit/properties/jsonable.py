"""Numbers and arrays that stay as they are: as plain types of JSON and back, and frozen."""

from __future__ import annotations

from typing import Any

import numpy as np

__all__ = ["from_plain", "frozen", "to_plain"]


def frozen(value: Any) -> Any:
    """A copy of an array that nobody can write into; anything else as it is."""
    if not isinstance(value, np.ndarray):
        return value
    copy = value.copy()
    copy.flags.writeable = False
    return copy


def to_plain(value: Any) -> Any:
    """Floats and nested lists; NaN as None, which JSON has."""
    if isinstance(value, np.ndarray):
        return [to_plain(item) for item in value]
    number = float(value)
    return None if np.isnan(number) else number


def from_plain(value: Any) -> Any:
    """Back from `to_plain`: arrays of floats, and floats."""
    if isinstance(value, list):
        return np.array(value, dtype=float)
    return float("nan") if value is None else value
