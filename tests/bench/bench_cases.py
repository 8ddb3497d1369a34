"""What is measured: temperatures, compositions, and the six-component mixture."""

from __future__ import annotations

from typing import Any

import numpy as np

LOW, HIGH = 293.15, 313.15  # K; inside every record that is timed
TEMPERATURES = np.linspace(LOW, HIGH, 1000).tolist()
STRINGS = [f"{celsius:.1f} degC" for celsius in np.linspace(20.0, 40.0, 100)]

# An invented recipe; pairs without a record are estimated. Narrow records narrow its range.
SIX = {
    "water": "rest",
    "glycerol": 0.20,
    "ethanol": 0.10,
    "propylene_glycol": 0.10,
    "ethylene_glycol": 0.10,
    "dimethyl_sulfoxide": 0.05,
}
INSIDE_SIX = np.linspace(299.0, 302.0, 1000).tolist()


def temperatures(count: int) -> Any:
    """That many temperatures [K], in no order."""
    return np.random.default_rng(2026).uniform(LOW, HIGH, count)


def fractions(count: int) -> Any:
    """That many mass fractions, in no order."""
    return np.random.default_rng(1).uniform(0.05, 0.95, count)
