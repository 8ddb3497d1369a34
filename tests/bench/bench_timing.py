"""Timing by turns: ours, the rival, ours, ... in one process, so that both see the same machine.

Calls are timed by the processor's clock: all of them run on one thread and wait for nothing, and
a neighbour's load on the machine would count as ours by the clock on the wall.
"""

from __future__ import annotations

import os
import statistics
import subprocess
import sys
import tempfile
from collections.abc import Callable, Iterable
from time import process_time
from typing import Any, NamedTuple


class Duel(NamedTuple):
    """Median seconds of ours and the rival, and the median of the ratios of neighbouring turns."""

    ours: float
    rival: float
    ratio: float


def seconds(call: Callable[[], Any]) -> float:
    """How long one call takes."""
    begun = process_time()
    call()
    return process_time() - begun


def duel(ours: Callable[[], Any], rival: Callable[[], Any], turns: int = 9) -> Duel:
    """Time two calls by turns; the first turn of each warms up and is dropped."""
    pairs = [(seconds(ours), seconds(rival)) for _ in range(turns + 1)][1:]
    return Duel(
        statistics.median(a for a, _ in pairs),
        statistics.median(b for _, b in pairs),
        statistics.median(a / b for a, b in pairs),
    )


def per_call(call: Callable[[Any], Any], arguments: Iterable[Any], rounds: int = 31) -> float:
    """Median seconds of one scalar call, over rounds through different arguments.

    Different arguments: a look-up that only remembered its last answer would gain nothing.
    """
    values = list(arguments)
    times = []
    for _ in range(rounds + 1):
        begun = process_time()
        for value in values:
            call(value)
        times.append((process_time() - begun) / len(values))
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

PINT = """
import numpy
from time import perf_counter, process_time
def now():
    return perf_counter(), process_time()
a = now()
import pint
pint.get_application_registry().Quantity(1.0, "mPa*s")
b = now()
print(b[0] - a[0], b[1] - a[1])
"""


def _steps(script: str, environment: dict[str, str]) -> list[tuple[float, ...]]:
    run = subprocess.run(
        [sys.executable, "-c", script],
        capture_output=True,
        text=True,
        check=True,
        env=environment,
    )
    return [tuple(map(float, line.split())) for line in run.stdout.splitlines()]


def start_costs(script: str = STARTS, runs: int = 9) -> list[tuple[float, float]]:
    """Median seconds by the clock and of the processor, each step of a script in new processes.

    The default's steps: numpy, dropkit on top, the first SI look-up, the first unit string. On a
    busy machine the processor's time says more.
    """
    with tempfile.TemporaryDirectory() as folder:
        # Compiled modules are kept, as on a user's machine, whatever this environment says.
        kept = {"PYTHONPYCACHEPREFIX": folder, "PYTHONDONTWRITEBYTECODE": ""}
        results = [_steps(script, {**os.environ, **kept}) for _ in range(runs + 1)]
    steps = zip(*results[1:], strict=True)  # the first run compiles the modules
    return [
        (statistics.median(a for a, _ in step), statistics.median(b for _, b in step))
        for step in steps
    ]
