"""Whatever comes in: an answer, or an error of dropkit's own."""

from __future__ import annotations

from typing import Any

import numpy as np
import pandas as pd
import pytest

import dropkit as dk
from dropkit.design import Stream, stream
from dropkit.design.stream_given import INPUTS
from dropkit.errors import DropkitError

WATER = dk.liquid("water").at(293.15).si()
BASES: tuple[dict[str, float], ...] = (
    {"drop_diameter": 1e-4, "frequency": 2e4},
    {"nozzle_diameter": 6e-5, "gauge_pressure": 4e4, "frequency": 2e4},
    {"velocity": 5.0},
)
ODD: tuple[Any, ...] = (
    np.array([]), 1 + 2j, "abc", "3 furlongs", True, np.nan, np.inf, -1.0, 0.0, 1e-300, 1e300,
    [1e-4, np.nan], pd.Series([1e-4, 2e-4]), {}, np.float32(1e-4), np.array(1e-4), ("a", 1), 0.4,
)  # fmt: skip


@pytest.mark.parametrize("word", INPUTS)
def test_an_answer_or_an_error_of_ours(word):
    answers = 0
    for value in ODD:
        for base, outside in zip(BASES, ("raise", "nan", "allow"), strict=True):
            try:
                found = stream(WATER, outside=outside, plausible=False, **{**base, word: value})
            except DropkitError:
                continue
            answers += 1
            assert isinstance(found, Stream)
            assert repr(found)
            assert set(found.to_dict()["quantities"]) == set(found.found)
            assert not any(np.isinf(each).any() for each in found.found.values())
    assert answers
