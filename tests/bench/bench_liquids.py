"""A made-up data folder of many liquids: copies of the real records under invented names."""

from __future__ import annotations

import re
import shutil
from itertools import cycle
from pathlib import Path

from dropkit import records
from dropkit.record_index import index_text, selection_text
from dropkit.record_store import INDEX, MARKER, SELECTION, Store, seal_of
from dropkit.sealing import sealed_text

__all__ = ["ASKED", "FIRST_CHOICES", "made_up_folder"]

# For bench_timing.start_costs: what the first calls of a new process cost, pandas apart.
FIRST_CHOICES = """
import numpy
from time import perf_counter, process_time
def now():
    return perf_counter(), process_time()
a = now()
import pandas
b = now()
import dropkit as dk
from dropkit import records
records._STORE = records.Store({root!r})
c = now()
dk.liquids()
d = now()
dk.choose(**{asked!r})
e = now()
for begun, ended in ((a, b), (c, d), (d, e)):
    print(ended[0] - begun[0], ended[1] - begun[1])
"""

ASKED = {
    "viscosity": ("2 mPa*s", "5 mPa*s"),
    "flash_point_above": "60 degC",
    "at": "20 degC",
}


def made_up_folder(root: Path, count: int = 150) -> Path:
    """Write that many liquids, sealed and with index and table; gives `root` back."""
    import tomllib

    real = records.data_dir()
    names = sorted(records.selection())
    (root / "liquids").mkdir(parents=True)
    shutil.copy(real / MARKER, root / MARKER)
    for number, name in zip(range(count), cycle(names), strict=False):
        text = (real / f"liquids/{name}.toml").read_text(encoding="utf-8")
        text = re.sub(r"^name = .*$", f'name = "{name} copy {number}"', text, flags=re.MULTILINE)
        text = re.sub(r"^cas = .*$", 'cas = ""', text, flags=re.MULTILINE)
        text = re.sub(
            r"^synonyms = \[.*?\]$",
            f'synonyms = ["invented {number} a", "invented {number} b", "invented {number} c"]',
            text,
            flags=re.MULTILINE | re.DOTALL,
        )
        path = root / f"liquids/{name}_copy_{number}.toml"
        path.write_text(sealed_text(text, seal_of(tomllib.loads(text))), encoding="utf-8")
    index, selection = Store(str(root)).scan_all()
    (root / INDEX).write_text(index_text(index), encoding="utf-8")
    (root / SELECTION).write_text(selection_text(selection), encoding="utf-8")
    return root
