"""Known faults"""

from __future__ import annotations

from typing import Final, NamedTuple

__all__ = ["EXCLUDED"]


class Fault(NamedTuple):
    cas: str
    property: str
    methods: tuple[str, ...]
    reason: str


EXCLUDED: Final[tuple[Fault, ...]] = ()
