"""Every example runs in an empty folder, warns of nothing and ends with the results it claims.

An example is a script whose ``main()`` returns a dict of named results; run as a script it calls
``main()``. EXPECTED states some of them, so that an example cannot rot unnoticed.
"""

from __future__ import annotations

import json
import math
import re
import subprocess
import sys
from pathlib import Path
from typing import Any

import pytest

ROOT = Path(__file__).parents[2]
EXAMPLES = sorted((ROOT / "examples").glob("*.py"))

# Example -> result -> (value, relative tolerance), or text that must be in it.
EXPECTED: dict[str, dict[str, tuple[float, float] | str]] = {
    "size_a_drop_stream.py": {
        # 30 % glycerol at 20 degC: Segur and Oberstar (1951) to the 2.5 % that is promised,
        # Bosart and Snoddy (1927) to 0.06 %
        "viscosity": (2.50e-3, 0.025),
        "density": (1072.7, 0.0006),
        # 3000 spheres of 600 um a second through 320 um: 2/3 d^3 f / D^2, by hand
        "velocity": (4.21875, 1e-6),
        # Rayleigh (1878): 4.508 jet diameters
        "wavelength_rayleigh": (4.508 * 320e-6, 3e-4),
        "frequency_rayleigh": (4.21875 / (4.508 * 320e-6), 3e-4),
        # what was wanted comes out
        "drop": (600e-6, 1e-9),
    },
}

# Files that an example must leave behind, not empty, in the folder where it ran.
WRITES: dict[str, list[str]] = {
    "size_a_drop_stream.py": ["drop_stream.csv", "drop_stream.png"],
}

# An example must not load these: each costs a user up to a second.
ENGINES = ["CoolProp", "thermo"]

RUNNER = """
import json, runpy, sys
namespace = runpy.run_path(sys.argv[1], run_name="__example__")
results = namespace["main"]()
print()
print(json.dumps({
    "results": {name: getattr(value, "magnitude", value) for name, value in results.items()},
    "engines": [name for name in %r if name in sys.modules],
}, default=str))
"""


@pytest.fixture(scope="module", params=EXAMPLES, ids=lambda path: path.stem)
def outcome(
    request: pytest.FixtureRequest, tmp_path_factory: pytest.TempPathFactory
) -> tuple[Path, Path, dict[str, Any]]:
    """One run of an example: its file, the folder where it ran, what it said."""
    folder = tmp_path_factory.mktemp(request.param.stem)
    run = subprocess.run(
        [sys.executable, "-W", "error", "-c", RUNNER % ENGINES, str(request.param)],
        cwd=folder,
        capture_output=True,
        text=True,
        check=False,
    )
    assert run.returncode == 0, run.stderr
    assert run.stderr == ""
    *printed, last = run.stdout.splitlines()
    assert "\n".join(printed).strip(), "an example prints what it found"
    return request.param, folder, {**json.loads(last), "printed": printed}


def test_there_are_examples() -> None:
    names = {path.name for path in EXAMPLES}
    assert names, "no examples/*.py"
    assert set(EXPECTED) == names, "state in EXPECTED what each example must find"
    assert set(WRITES) <= names


def test_ends_with_its_named_results(outcome: tuple[Path, Path, dict[str, Any]]) -> None:
    example, _, said = outcome
    results = said["results"]
    assert results
    assert not [k for k, v in results.items() if isinstance(v, float) and not math.isfinite(v)]
    for name, expected in EXPECTED.get(example.name, {}).items():
        if isinstance(expected, str):
            assert expected in results[name]
        else:
            value, tolerance = expected
            assert results[name] == pytest.approx(value, rel=tolerance), name


def test_leaves_the_files_that_it_names(outcome: tuple[Path, Path, dict[str, Any]]) -> None:
    example, folder, _ = outcome
    for name in WRITES.get(example.name, []):
        assert (folder / name).stat().st_size > 0, name


def test_loads_no_engine(outcome: tuple[Path, Path, dict[str, Any]]) -> None:
    _, _, said = outcome
    assert said["engines"] == []


def test_the_readme_quotes_the_first_job_as_it_is(
    outcome: tuple[Path, Path, dict[str, Any]],
) -> None:
    example, _, said = outcome
    if example.name != "size_a_drop_stream.py":
        return
    readme = (ROOT / "README.md").read_text(encoding="utf-8")
    (quoted,) = re.findall(r"^```text\n(Wanted:.*?)^```", readme, re.MULTILINE | re.DOTALL)
    printed = iter(" ".join(line.split()) for line in said["printed"])
    for line in quoted.splitlines():
        # In this order, with others between: `in` uses the lines up.
        assert " ".join(line.split()) in printed, f"README.md quotes: {line}"


def test_runs_as_a_script() -> None:
    for example in EXAMPLES:
        last = example.read_text(encoding="utf-8").rstrip().splitlines()[-2:]
        assert last[0] == 'if __name__ == "__main__":', example.name
        assert last[1].startswith("    main("), example.name
