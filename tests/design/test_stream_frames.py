"""A table of designs: each row as one `stream`, refused ones with the reason."""

from __future__ import annotations

import numpy as np
import pandas as pd
import pytest

from dropkit.design import stream, streams
from dropkit.errors import BadInput, UnknownName

ROWS = pd.DataFrame(
    {
        "batch": list("abcdef"),
        "drop_diameter [um]": [100.0, 80.0, -5.0, np.nan, 60.0, 100.0],
        "frequency [kHz]": [20.0, np.nan, 10.0, 20.0, 20.0, 20.0],
        "jet_diameter [um]": [np.nan, 42.0, np.nan, np.nan, 50.0, np.nan],
        "velocity [m/s]": [np.nan, 6.0, np.nan, np.nan, np.nan, np.nan],
        "temperature [degC]": [20.0, 20.0, 20.0, 20.0, 20.0, 900.0],
    },
    index=[10, 11, 12, 13, 14, 15],
)


def test_rows_are_streams():
    found = streams(ROWS, "water")
    assert list(found.index) == list(ROWS.index)
    one = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz").si()
    assert found.loc[10, "gauge_pressure [kPa]"] == pytest.approx(one.gauge_pressure / 1e3)
    assert found.loc[10, "margin"] == pytest.approx(one.margin)
    two = stream(
        "water", "20 degC", drop_diameter="80 um", jet_diameter="42 um", velocity="6 m/s"
    ).si()
    assert found.loc[11, "frequency [kHz] found"] == pytest.approx(two.frequency / 1e3)
    assert found["feasible"].tolist() == [True, True, False, False, False, False]


@pytest.mark.parametrize(
    ("row", "reason"),
    [(12, "not positive"), (13, "too few facts"), (14, "cut-off"), (15, "out of range")],
)
def test_refused_rows_say_why(row, reason):
    found = streams(ROWS, "water")
    assert reason in found.loc[row, "reason"]
    assert np.isnan(found.loc[row, "gauge_pressure [kPa]"])


def test_si_columns_and_common_inputs():
    table = pd.DataFrame({"drop_diameter": [1e-4, 2e-4], "frequency": [2e4, 1e4]})
    found = streams(table, "water", 293.15, holes=4, pressure_limit=5e4)
    assert found["total_flow"].to_numpy() == pytest.approx(4 * found["flow"].to_numpy())
    with pytest.raises(BadInput, match="given twice"):
        streams(table, "water", 293.15, frequency=1e4)
    with pytest.raises(UnknownName, match="frequency"):
        streams(table.rename(columns={"frequency": "frequncy"}), "water", 293.15)
    with pytest.raises(UnknownName, match="holes"):
        streams(table, "water", 293.15, hoels=3)
    with pytest.raises(BadInput, match="given twice"):
        streams(table.assign(temperature=300.0), "water", 293.15)
    with pytest.raises(BadInput):
        streams(table.assign(frequency=["a", "b"]), "water", 293.15)


def test_empty_table():
    assert len(streams(ROWS.iloc[:0], "water")) == 0
