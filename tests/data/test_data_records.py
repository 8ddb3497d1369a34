"""Every file in data/: records, sources, published points, exclusions, the index."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any

import pytest
import record_checks as checks

from dropkit import records, sealing

REAL = checks.Folder(records.data_dir())


def test_the_folder_is_sealed_and_its_index_up_to_date(
    capsys: pytest.CaptureFixture[str],
) -> None:
    status = sealing.main(["check"])
    said = capsys.readouterr()
    assert status == 0, said.err
    count = len(REAL.names()) + len(REAL.store.stems("thickeners"))
    assert said.out.startswith(f"{count} files: ")


@pytest.mark.parametrize("name", REAL.names())
@pytest.mark.parametrize("check", checks.RECORD_CHECKS, ids=lambda check: check.__name__)
def test_record(check: Callable[..., list[str]], name: str) -> None:
    problems = check(REAL, name, REAL.record(name))
    assert not problems, "\n".join(problems)


@pytest.mark.parametrize("key", sorted(REAL.store.stems("sources")))
def test_source(key: str) -> None:
    source: Any = REAL.store.source(key)
    assert source.key == key
    assert source.doi == "" or source.doi.startswith("10."), source.doi
    assert source.seen


@pytest.mark.parametrize("name", REAL.published())
def test_published_points(name: str) -> None:
    problems = checks.published(REAL, name)
    assert not problems, "\n".join(problems[:20])


def test_excluded_points_exist() -> None:
    problems = checks.excluded(REAL)
    assert not problems, "\n".join(problems[:20])


@pytest.mark.parametrize("name", [name for name in REAL.names() if name.startswith("liquids/")])
def test_names_of_files_are_plain(name: str) -> None:
    key = name.partition("/")[2]
    assert key == key.lower()
    assert " " not in key
    assert "__" not in key
