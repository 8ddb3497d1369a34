"""Limits that the trade quotes: complete, sourced, and on the right side."""

from __future__ import annotations

import itertools
import math
from typing import Any

import numpy as np
import pytest

from dropkit import numbers
from dropkit.errors import BadInput, UnknownName
from dropkit.numbers.catalogue import entries
from dropkit.numbers.limits import LIMITS, Limit, limits_of
from dropkit.records import source

every_limit = pytest.mark.parametrize(
    "limit", LIMITS, ids=lambda limit: f"{limit.number}-{limit.source or limit.seen}"
)


@every_limit
def test_a_limit_is_complete(limit: Limit) -> None:
    assert limit.number in {entry.name for entry in entries()}
    assert len(limit.sides) == len(limit.bounds) + 1
    assert list(limit.bounds) == sorted(set(limit.bounds))
    assert limit.applies
    assert bool(limit.source) == (limit.seen != "practice")


@every_limit
def test_a_limit_has_a_source_that_says_how_it_was_seen(limit: Limit) -> None:
    if limit.source:
        entry = source(limit.source)
        assert entry.citation
        assert ("memory" in entry.seen) or limit.seen != "memory"


@every_limit
def test_sides(limit: Limit) -> None:
    ends = (limit.bounds[0] - 1.0, *limit.bounds, limit.bounds[-1] + 1.0)
    middles = [(low + high) / 2 for low, high in itertools.pairwise(ends)]
    assert tuple(limit.side(value) for value in middles) == limit.sides
    assert limit.side(math.nan) == "unknown"


# As in the project's reference, with the mark that it gives to each.
@pytest.mark.parametrize(
    ("number", "bounds", "seen"),
    [
        ("z_number", (1.0, 10.0), "memory"),  # Reis and Derby 2000 [M]
        ("z_number", (4.0, 14.0), "abstract"),  # Jang, Kim and Moon 2009 [S: abstract]
        ("z_number", (2.0,), "memory"),  # Fromm 1984 [M]
        ("weber", (4.0,), "memory"),  # Derby 2010 [M]
        ("weber", (8.0,), "second hand"),  # dripping to Rayleigh [S2]
        ("gas_weber", (0.4, 13.0, 40.3), "second hand"),  # regimes [S2]
        ("gas_weber", (11.0, 35.0, 80.0, 350.0), "text"),  # Guildenbecher et al. 2009 [S]
        ("splash_parameter", (50.0,), "memory"),  # Stow and Hadfield / Derby [M]
        ("splash_parameter", (57.7,), "second hand"),  # Mundo et al. 1995 [S2]
        ("wavelength_ratio", (3.5, 7.0), "memory"),  # Schneider and Hendricks 1964 [M]
    ],
)
def test_trust_marks_are_carried_over(number: str, bounds: tuple[float, ...], seen: str) -> None:
    found = {limit.bounds: limit.seen for limit in limits_of(number)}
    assert found[bounds] == seen


def test_contradicting_windows_stand_side_by_side() -> None:
    said = {limit.source: limit.side(2.74) for limit in limits_of("z_number")}
    assert said["JangKimMoon2009"] == "too viscous"
    assert said["ReisDerby2000"] == "drops form"


def test_a_number_without_limits_has_none_and_an_unknown_one_raises() -> None:
    assert limits_of("galilei") == ()
    with pytest.raises(UnknownName, match="weber"):
        numbers.limits_of("webber")


@pytest.mark.parametrize("name", [np.array([1.0, 2.0]), np.array(["weber"]), None, 3.0], ids=str)
def test_only_text_names_a_number(name: Any) -> None:
    with pytest.raises(BadInput, match="names no number"):
        limits_of(name)
