"""Listing and filtering 150 liquids, copies of the real records.

Run with ``python -m pytest tests/bench --benchmark-only``; ordinary runs skip these.
"""

from __future__ import annotations

from pathlib import Path
from typing import Any

import pytest
from bench_liquids import ASKED, made_up_folder

import dropkit as dk
from dropkit import records


@pytest.fixture(scope="module")
def folder(tmp_path_factory: pytest.TempPathFactory) -> Path:
    return made_up_folder(tmp_path_factory.mktemp("many") / "data")


@pytest.mark.benchmark(group="150 liquids")
@pytest.mark.parametrize("what", ["list", "search", "filter", "filter, read anew"])
def test_find_among_many(
    benchmark: Any, folder: Path, monkeypatch: pytest.MonkeyPatch, what: str
) -> None:
    monkeypatch.setattr(records, "_STORE", records.Store(str(folder)))

    def anew() -> Any:
        records._STORE = records.Store(str(folder))
        return dk.choose(**ASKED)

    calls = {
        "list": dk.liquids,
        "search": lambda: dk.liquids("copy 12"),
        "filter": lambda: dk.choose(**ASKED),
        "filter, read anew": anew,
    }
    answer = benchmark(calls[what])
    assert len(answer) == 150 if what == "list" else 1 <= len(answer) < 150
