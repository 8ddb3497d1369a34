"""The first use of everything at once from 16 threads, in a fresh process."""

from __future__ import annotations

import subprocess
import sys

CODE = """
import threading
barrier = threading.Barrier(16)
results, problems = [], []

def work(number):
    try:
        barrier.wait()
        import dropkit as dk
        ink = dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass")
        state = ink.at("32 degC")
        weber = dk.numbers.weber(state.density, state.surface_tension, "7 m/s", "60 um")
        wave = dk.models.jet.most_unstable_wavelength_inviscid("60 um")
        table = dk.compare("IPA", "acetone", at="25 degC").to_numpy().tolist()
        air = dk.air("25 degC").density.magnitude
        results.append((ink.viscosity(305.15), weber, wave.magnitude, str(table), air,
                        len(dk.cite(state)), dk.mixture({"toluene": 0.5, "acetone": "rest"},
                        by="mass", estimates="allow").viscosity(298.15)))
    except BaseException as problem:
        problems.append(repr(problem))

threads = [threading.Thread(target=work, args=(n,)) for n in range(16)]
[thread.start() for thread in threads]
[thread.join() for thread in threads]
assert not problems, problems[0]
assert len(results) == 16 and len(set(results)) == 1, results
print("agree")
"""


def test_sixteen_threads_at_a_cold_start():
    for _ in range(3):
        done = subprocess.run(
            [sys.executable, "-c", CODE], capture_output=True, text=True, check=False
        )
        assert done.stdout.strip() == "agree", done.stderr
