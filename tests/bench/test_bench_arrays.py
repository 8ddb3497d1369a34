"""Array look-ups beside the bare numpy line and beside the engines' array paths.

Run with ``python -m pytest tests/bench --benchmark-only``; ordinary runs skip these.
"""

from __future__ import annotations

from typing import Any

import numpy as np
import pytest
from bench_cases import HIGH, LOW, fractions, temperatures
from bench_rivals import ENGINES, bare, bare_viscosity_of_pair

import dropkit as dk

MILLION = 1_000_000
PURE = [
    ("water", "viscosity"),
    ("water", "density"),
    ("glycerol", "viscosity"),
    ("ethanol", "density"),
]


@pytest.mark.parametrize("whose", ["dropkit", "bare"])
@pytest.mark.parametrize(("liquid", "prop"), PURE)
def test_a_million_temperatures(benchmark: Any, liquid: str, prop: str, whose: str) -> None:
    benchmark.group = f"1e6 temperatures, {prop} of {liquid}"
    T = temperatures(MILLION)
    ours, rival = getattr(dk.liquid(liquid), prop), bare(liquid, prop, LOW, HIGH)
    answer = benchmark(ours if whose == "dropkit" else rival, T)
    assert np.allclose(answer, (rival if whose == "dropkit" else ours)(T), rtol=1e-12)


@pytest.mark.parametrize("prop", ENGINES)
def test_ours_at_the_engines_temperatures(benchmark: Any, prop: str) -> None:
    benchmark.group = f"1e4 temperatures, {prop} of water"
    T = temperatures(10_000)
    assert np.isfinite(benchmark(getattr(dk.liquid("water"), prop), T)).all()


@pytest.mark.parametrize(("prop", "number"), [(p, i) for p in ENGINES for i in range(3)])
def test_engines(benchmark: Any, prop: str, number: int) -> None:
    named = list(ENGINES[prop]().items())
    if number >= len(named):
        pytest.skip("fewer engines give this")
    benchmark.group = f"1e4 temperatures, {prop} of water"
    benchmark.extra_info["call"] = named[number][0]
    T = temperatures(10_000)
    answer = benchmark(named[number][1], T)
    # They agree with the record as far as the engine's own equation allows.
    assert np.allclose(answer, getattr(dk.liquid("water"), prop)(T), rtol=0.03)


@pytest.mark.benchmark(group="1e6 (composition, temperature) points, viscosity of glycerol-water")
@pytest.mark.parametrize("whose", ["dropkit", "dropkit, mixture made before", "bare"])
def test_a_million_points_of_a_binary(benchmark: Any, whose: str) -> None:
    w, T = fractions(MILLION), temperatures(MILLION)
    rival = bare_viscosity_of_pair("glycerol", "water", LOW, HIGH)
    made = dk.mixture({"glycerol": w, "water": "rest"}, by="mass")

    def ours() -> Any:
        return dk.mixture({"glycerol": w, "water": "rest"}, by="mass").viscosity(T)

    calls = {
        "dropkit": ours,
        "dropkit, mixture made before": lambda: made.viscosity(T),
        "bare": lambda: rival(w, T),
    }
    assert np.allclose(benchmark(calls[whose]), rival(w, T), rtol=1e-9)
