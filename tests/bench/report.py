"""Prints how fast dropkit is beside what was promised: python tests/bench/report.py [--tables].

Every figure is a median of several turns, ours and the rival by turns in one process, in processor
time; what a new process costs is by the clock on the wall. Nothing here asserts anything: machines
differ, and the table says so where a figure falls short. ``--tables`` adds CoolProp's batch call
on a table of its own, which takes 20 s to build.
"""

from __future__ import annotations

import os
import platform
import sys
import tempfile
from collections.abc import Iterator
from importlib import metadata
from pathlib import Path
from typing import NamedTuple

import numpy as np
import pint
from bench_cases import HIGH, LOW, SIX, STRINGS, TEMPERATURES, fractions, temperatures
from bench_growth import newton, points, scalar_roots
from bench_liquids import ASKED, FIRST_CHOICES, made_up_folder
from bench_rivals import ENGINES, bare, bare_viscosity_of_pair, tabulated_water_viscosity
from bench_timing import PINT, duel, per_call, start_costs

import dropkit as dk
from dropkit import records

MILLION = 1_000_000
PURE = [
    ("water", "viscosity"),
    ("water", "density"),
    ("water", "surface_tension"),
    ("glycerol", "viscosity"),
    ("ethanol", "density"),
]


class Row(NamedTuple):
    """One line of the table; `reach` None where nothing was promised."""

    what: str
    measured: float
    reach: float | None
    unit: str
    rival: str
    more_is_better: bool = False

    def text(self) -> str:
        """The line as printed."""
        if self.reach is None:
            promised, verdict = "", ""
        else:
            met = (
                self.measured >= self.reach if self.more_is_better else self.measured <= self.reach
            )
            promised = f"{'>=' if self.more_is_better else '<='} {self.reach:g}"
            verdict = "met" if met else "MISSED"
        return f"{self.what:<58}{self.measured:>9.3g} {self.unit:<5}{promised:>8}  {verdict:<7} {self.rival}"


def starts() -> Iterator[Row]:
    """Costs of a new process."""
    named = [
        ("import numpy, for scale", None, ""),
        ("import dropkit, numpy there already", 30, ""),
        ("first SI look-up, more", 50, ""),
        ("first unit string, more", 250, ", pint and its registry included"),
        ("pint and its registry alone, for scale", None, ""),
    ]
    costs = start_costs() + start_costs(PINT)
    for (what, reach, note), (clock, processor) in zip(named, costs, strict=True):
        yield Row(what, clock * 1e3, reach, "ms", f"{processor * 1e3:.3g} ms of processor{note}")


def scalars() -> Iterator[Row]:
    """Costs of one answer."""
    water = dk.liquid("water").viscosity
    two = dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass").viscosity
    six = dk.mixture(SIX, by="mass", estimates="allow")
    typed = bare("water", "viscosity", LOW, HIGH)
    yield Row(
        "numpy expression typed in, one float", per_call(typed, TEMPERATURES) * 1e6, None, "us", ""
    )
    yield Row("scalar look-up, pure", per_call(water, TEMPERATURES) * 1e6, 1, "us", "")
    yield Row("scalar look-up, two components", per_call(two, TEMPERATURES) * 1e6, 3, "us", "")
    held = six.range("viscosity")  # of the pairs' records together
    inside = np.linspace(max(LOW, held.low), min(HIGH, held.high), 1000).tolist()
    yield Row("scalar look-up, six components", per_call(six.viscosity, inside) * 1e6, 8, "us", "")
    yield Row(
        "unit string, warm", per_call(water, STRINGS) * 1e6, 10, "us", f"{len(STRINGS)} strings"
    )
    registry = pint.get_application_registry()
    quantities = [registry.Quantity(kelvin, "kelvin") for kelvin in TEMPERATURES[:100]]
    yield Row("Quantity", per_call(water, quantities) * 1e6, 20, "us", "")


def arrays() -> Iterator[Row]:
    """A million temperatures, a million points of a binary."""
    T, w = temperatures(MILLION), fractions(MILLION)
    for liquid, prop in PURE:
        ours = getattr(dk.liquid(liquid), prop)
        line = bare(liquid, prop, LOW, HIGH)
        d = duel(lambda ours=ours: ours(T), lambda line=line: line(T))
        times = f"bare numpy line: {d.rival * 1e3:.1f} ms, ours {d.ours * 1e3:.1f} ms"
        yield Row(f"1e6 temperatures, {prop} of {liquid}", d.ratio, 1.3, "x", times)

    line = bare_viscosity_of_pair("glycerol", "water", LOW, HIGH)
    made = dk.mixture({"glycerol": w, "water": "rest"}, by="mass")
    calls = {
        "": lambda: dk.mixture({"glycerol": w, "water": "rest"}, by="mass").viscosity(T),
        ", mixture made before": lambda: made.viscosity(T),
    }
    for note, call in calls.items():
        d = duel(call, lambda: line(w, T))
        times = f"bare numpy: {d.rival * 1e3:.1f} ms, ours {d.ours * 1e3:.1f} ms"
        yield Row(f"1e6 points of glycerol-water, viscosity{note}", d.ratio, 2, "x", times)


def finding() -> Iterator[Row]:
    """Listing and filtering 150 liquids, copies of the real ones, first in new processes."""
    with tempfile.TemporaryDirectory() as folder:
        root = str(made_up_folder(Path(folder, "data"), 150))
        script = FIRST_CHOICES.format(root=root, asked=ASKED)
        named = ["import pandas, for scale", "list 150 liquids, first", "filter 150 liquids, first"]
        for what, (clock, processor) in zip(named, start_costs(script), strict=True):
            reach = 50 if "150" in what else None
            yield Row(what, clock * 1e3, reach, "ms", f"{processor * 1e3:.3g} ms of processor")
        own, records._STORE = records._STORE, records.Store(root)
        calls = {
            "list": dk.liquids,
            "search": lambda: dk.liquids("copy 12"),
            "filter": lambda: dk.choose(**ASKED),
        }
        try:
            for what, call in calls.items():
                cost = duel(call, lambda: None).ours
                yield Row(f"{what} 150 liquids, again", cost * 1e3, 50, "ms", "")
        finally:
            records._STORE = own


def growth() -> Iterator[Row]:
    """A million growth rates of the full viscous relation, and scipy point by point on a part."""
    grow = dk.models.jet.reduced_growth_viscous_full
    x, oh = points(MILLION)
    d = duel(lambda: grow(x, oh), lambda: newton(x, oh), 5)
    note = f"plain vectorised Newton {d.rival / MILLION * 1e6:.2f} us each"
    yield Row("1e6 growth rates, full relation, each", d.ours / MILLION * 1e6, 1, "us", note)
    part = 500
    each = duel(lambda: None, lambda: scalar_roots(x[:part], oh[:part]), 5).rival / part
    yield Row(
        "1e6 growth rates, times faster than a scalar root finder",
        each / (d.ours / MILLION),
        100,
        "x",
        f"scipy brentq {each * 1e6:.0f} us each on {part} of the points",
        more_is_better=True,
    )


def engines(tables: bool) -> Iterator[Row]:
    """Per element, against the array paths of the engines."""
    T, large = temperatures(10_000), temperatures(MILLION)
    for prop, make in ENGINES.items():
        ours = getattr(dk.liquid("water"), prop)
        mine = duel(lambda ours=ours: ours(large), lambda: None, 5).ours / large.size
        named = {
            name: duel(lambda call=call: call(T), lambda: None, 3).ours / T.size
            for name, call in make().items()
        }
        fastest = min(named, key=lambda name: named[name])
        for name, each in sorted(named.items(), key=lambda item: item[1]):
            yield Row(
                f"{prop} of water, times faster than the engine",
                each / mine,
                50 if name == fastest else None,
                "x",
                f"{name}: {each * 1e9:.0f} ns each, ours {mine * 1e9:.1f}",
                more_is_better=True,
            )
    if tables:
        with tempfile.TemporaryDirectory() as folder:
            call = tabulated_water_viscosity(folder)
            each = duel(lambda: call(large), lambda: None, 5).ours / large.size
            ours = dk.liquid("water").viscosity
            mine = duel(lambda: ours(large), lambda: None, 5).ours / large.size
            worst = np.max(np.abs(call(large) / ours(large) - 1))
        name = f"CoolProp fast_evaluate on a bicubic table: {each * 1e9:.0f} ns each, off by {worst:.1%}"
        yield Row("viscosity of water, times faster than the table", each / mine, None, "x", name)


def main() -> None:
    """Print the table."""
    versions = ", ".join(
        f"{n} {metadata.version(n)}" for n in ("numpy", "pint", "CoolProp", "thermo")
    )
    print(
        f"Python {platform.python_version()}, {versions}; {platform.machine()}, {os.cpu_count()} cores"
    )
    print(f"load before: {os.getloadavg()[0]:.1f}\n" if hasattr(os, "getloadavg") else "")
    print(f"{'what':<58}{'measured':>14}{'promised':>9}           beside")
    for part in (
        starts(),
        finding(),
        scalars(),
        arrays(),
        growth(),
        engines("--tables" in sys.argv),
    ):
        for row in part:
            print(row.text(), flush=True)


if __name__ == "__main__":
    main()
