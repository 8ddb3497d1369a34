"""Scalar look-ups, beside the same arithmetic typed in by hand.

Run with ``python -m pytest tests/bench --benchmark-only``; ordinary runs skip these.
"""

from __future__ import annotations

from typing import Any

import numpy as np
import pint
import pytest
from bench_cases import INSIDE_SIX, SIX, STRINGS, TEMPERATURES
from bench_rivals import bare

import dropkit as dk


def sweep(call: Any, arguments: Any) -> Any:
    """Call once for each argument; the last answer."""
    for argument in arguments:
        answer = call(argument)
    return answer


@pytest.mark.benchmark(group="scalar look-up, 1000 temperatures")
@pytest.mark.parametrize("what", ["bare expression", "pure", "two components", "six components"])
def test_scalar_si(benchmark: Any, what: str) -> None:
    calls = {
        "bare expression": lambda: bare("water", "viscosity", 275.0, 370.0),
        "pure": lambda: dk.liquid("water").viscosity,
        "two components": lambda: (
            dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass").viscosity
        ),
        "six components": lambda: dk.mixture(SIX, by="mass", estimates="allow").viscosity,
    }
    call = calls[what]()
    kelvins = INSIDE_SIX if what == "six components" else TEMPERATURES
    answer = benchmark(sweep, call, kelvins)
    assert answer == pytest.approx(call(kelvins[-1]))
    assert 1e-4 < answer < 1.0


@pytest.mark.benchmark(group="look-up with units, warm")
@pytest.mark.parametrize("what", ["string", "Quantity"])
def test_scalar_with_units(benchmark: Any, what: str) -> None:
    call = dk.liquid("water").viscosity
    registry = pint.get_application_registry()
    quantities = [registry.Quantity(kelvin, "kelvin") for kelvin in TEMPERATURES[:100]]
    asked = STRINGS if what == "string" else quantities
    answer = benchmark(sweep, call, asked)
    assert 0.2 < answer.to("mPa*s").magnitude < 2.0


@pytest.mark.benchmark(group="dimensionless number")
@pytest.mark.parametrize("what", ["bare", ".si", "boundary, SI", "boundary, strings"])
def test_a_number(benchmark: Any, what: str) -> None:
    weber = dk.numbers.weber
    plain = (1090.0, 0.069, 7.0, 60e-6)
    strings = ("1090 kg/m3", "69 mN/m", "7 m/s", "60 um")

    def bare_weber(rho: float, sigma: float, u: float, d: float) -> float:
        return rho * u * u * d / sigma

    call = {"bare": bare_weber, ".si": weber.si}.get(what, weber)
    answer = benchmark(call, *(strings if "strings" in what else plain))
    assert np.isclose(answer, 1090.0 * 49.0 * 60e-6 / 0.069)
