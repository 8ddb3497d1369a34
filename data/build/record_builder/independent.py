"""The points that a finished record was checked against, without fitting anything again."""

from __future__ import annotations

import tomllib
from collections.abc import Iterator
from pathlib import Path

from record_builder.blocks import _Block as Block
from record_builder.command import _folder as folder_of
from record_builder.command import _subject as subject_of
from record_builder.points import Point, Published, within

__all__ = ["independent_points"]


def independent_points(name: str, data: Path) -> Iterator[tuple[str, int, list[Point]]]:
    """Property, number of the block, and the points of its second sources inside its range."""
    path = data / "build" / "specs" / folder_of(name) / f"{name.rpartition('/')[2]}.toml"
    with path.open("rb") as handle:
        spec = tomllib.load(handle)
    published = Published(data / "published")
    subject = subject_of(name, spec, data)
    for prop, blocks in spec.items():
        if not isinstance(blocks, list) or not blocks or not isinstance(blocks[0], dict):
            continue
        for number, entry in enumerate(blocks, start=1):
            block = Block(subject, prop, entry, published)
            found = block.usable(block.select("second"))
            yield prop, number, [p for p in found if within(p, block.range, block.fractions)]
