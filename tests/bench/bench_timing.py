"""Timing by turns: ours, the rival, ours, ... in one process, so that both see the same machine."""

from __future__ import annotations

import statistics
import subprocess
import sys
from collections.abc import Callable, Iterable
from time import perf_counter
from typing import Any, NamedTuple


class Duel(NamedTuple):
    """Median seconds of ours and the rival, and the median of the ratios of neighbouring turns."""

    ours: float
    rival: float
    ratio: float


def seconds(call: Callable[[], Any]) -> float:
    """How long one call takes."""
    begun = perf_counter()
    call()
    return perf_counter() - begun


def duel(ours: Callable[[], Any], rival: Callable[[], Any], turns: int = 9) -> Duel:
    """Time two calls by turns; the first turn of each warms up and is dropped."""
    pairs = [(seconds(ours), seconds(rival)) for _ in range(turns + 1)][1:]
    return Duel(
        statistics.median(a for a, _ in pairs),
        statistics.median(b for _, b in pairs),
        statistics.median(a / b for a, b in pairs),
    )


def per_call(call: Callable[[Any], Any], arguments: Iterable[Any], rounds: int = 9) -> float:
    """Median seconds of one scalar call, over rounds through different arguments.

    Different arguments: a look-up that only remembered its last answer would gain nothing.
    """
    values = list(arguments)
    times = []
    for _ in range(rounds + 1):
        begun = perf_counter()
        for value in values:
            call(value)
        times.append((perf_counter() - begun) / len(values))
    return statistics.median(times[1:])


STARTS = """
from time import perf_counter, process_time
def now():
    return perf_counter(), process_time()
a = now()
import numpy
b = now()
import dropkit as dk
c = now()
dk.liquid("water").viscosity(305.15)
d = now()
dk.liquid("water").viscosity("32 degC")
e = now()
for begun, ended in ((a, b), (b, c), (c, d), (d, e)):
    print(ended[0] - begun[0], ended[1] - begun[1])
"""


def start_costs(runs: int = 9) -> list[tuple[float, float]]:
    """Median seconds by the clock and of the processor, each step in new processes.

    The steps: numpy, dropkit on top, the first SI look-up, the first unit string. On a busy
    machine the processor's time says more.
    """
    results = []
    for _ in range(runs + 1):
        run = subprocess.run(
            [sys.executable, "-c", STARTS], capture_output=True, text=True, check=True
        )
        results.append([tuple(map(float, line.split())) for line in run.stdout.splitlines()])
    steps = zip(*results[1:], strict=True)  # the first run compiles the modules
    return [
        (statistics.median(a for a, _ in step), statistics.median(b for _, b in step))
        for step in steps
    ]
