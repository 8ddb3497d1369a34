"""Which families make no one liquid with water."""

from __future__ import annotations

from typing import Any

import pytest

import dropkit as dk
from dropkit.errors import CompositionError

REPELLED = (
    *("limonene", "squalane", "methyl_oleate", "oleic_acid", "rapeseed_oil"),
    *("diethylhexyl_sebacate", "hexamethyldisiloxane", "polydimethylsiloxane_100"),
    *("perfluorohexane", "ethoxyperfluorobutane", "diesel", "gasoline", "isobornyl_acrylate"),
    *("propane", "hfa-134a", "n-heptane", "toluene"),
)


def mixed(parts: dict[str, float]) -> Any:
    return dk.mixture(parts, by="mass", estimates="allow")


@pytest.mark.parametrize("key", REPELLED)
def test_water_makes_two_phases_with_it(key: str) -> None:
    with pytest.raises(CompositionError, match="do not mix"):
        mixed({key: 0.5, "water": 0.5})


def test_the_family_is_named() -> None:
    with pytest.raises(CompositionError, match="siloxane"):
        mixed({"polydimethylsiloxane_50": 0.5, "water": 0.5})


def test_oils_and_siloxanes_still_mix_with_what_dissolves_them() -> None:
    for parts in (
        {"methyl_oleate": 0.5, "n-hexadecane": 0.5},
        {"hexamethyldisiloxane": 0.5, "decamethylcyclopentasiloxane": 0.5},
        {"rapeseed_oil": 0.3, "soybean_oil": 0.7},
    ):
        assert mixed(parts).density(298.15) > 700.0
