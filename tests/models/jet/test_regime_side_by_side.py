"""The regimes side by side, against a compiler's labels of measured jets."""

from __future__ import annotations

import pickle

import numpy as np
import pytest
from hypothesis import given
from hypothesis import strategies as st

from dropkit.errors import BadInput, UnitError, Unphysical
from dropkit.models import jet
from dropkit.published_rows import published_file
from dropkit.records import data_dir, source

WATER = (998.2, 1.0e-3, 0.0727)
AIR = 1.2
STUDIES = (
    "Arai1985",
    "Chen1962",
    "Grant1965",
    "Mansour1994",
    "Phinney1970",
    "Sallam2002",
    "Sterling1969",
)


def labelled() -> tuple[jet.JetRegimes, np.ndarray]:
    """Jets of seven studies with one regime as label [S2], and what the criteria say."""
    rows = [
        row
        for study in STUDIES
        for row in published_file(data_dir() / "published" / "jets" / f"{study}.csv")
        if row["regime"].replace("atomization", "atomisation") in jet.REGIMES
    ]

    def column(name: str) -> np.ndarray:
        return np.array([float(row[name]) for row in rows])

    air = column("ambient_pressure_Pa") * 0.0289652 / (8.314462618 * 298.15)
    found = jet.jet_regimes(
        column("density_kg_m3"),
        column("viscosity_Pa_s"),
        column("surface_tension_N_m"),
        column("speed_m_s"),
        column("jet_diameter_m"),
        air,
    )
    labels = [row["regime"].replace("atomization", "atomisation") for row in rows]
    return found, np.array(labels, dtype=object)


def by_gas(found: jet.JetRegimes, source_key: str) -> np.ndarray:
    """The regime by the gas alone, with the first limit of one source."""
    (first,) = (
        each
        for each in found.criteria
        if each.name.startswith("Rayleigh") and each.source == source_key
    )
    gas = first.value
    level = np.where(gas < first.limit, 1, 2 + (gas >= 13.0).astype(int) + (gas >= 40.3))
    return np.array(jet.REGIMES, dtype=object)[level]


def test_measured_jets() -> None:
    """The figures of the page: neither first limit is good, and they err in opposite ways."""
    found, labels = labelled()
    low, high = by_gas(found, "LinReitz1998"), by_gas(found, "SterlingSleicher1975")
    assert labels.size == 230
    assert ((low == labels).sum(), (high == labels).sum()) == (153, 175)
    right = {
        name: ((labels == name).sum(), (low == labels)[labels == name].sum(),
               (high == labels)[labels == name].sum())
        for name in jet.REGIMES[1:]
    }  # fmt: skip
    assert right == {
        "Rayleigh": (149, 103, 137),
        "first wind-induced": (58, 37, 25),
        "second wind-induced": (19, 9, 9),
        "atomisation": (4, 4, 4),
    }
    same = low == high
    assert (same.sum(), (same & (low == labels)).sum()) == (184, 141)


def test_measured_jets_below_a_weber_number_of_eight() -> None:
    """Six water jets of two studies were jets at 2.1 to 5.5: eight is no lower limit."""
    found, labels = labelled()
    weber = found.criteria[0].value
    assert found.criteria[0].limit[0] == 8.0
    below = weber[weber < 8.0]
    assert (below.size, below.min(), below.max()) == (6, pytest.approx(2.105, abs=2e-3),
                                                      pytest.approx(5.524, abs=2e-3))  # fmt: skip
    assert set(labels[weber < 8.0]) == {"Rayleigh"}
    # Two of them also below the 4 of a fine tube.
    assert (below < 4.0).sum() == 2


def test_reitz_1978_water_atomises() -> None:
    """Water into air, We 42800, We_g 55, Oh 0.0063: atomising [S2]."""
    speed = np.sqrt(42800.0)
    found = jet.jet_regimes(1.0, 0.0063, 1.0, speed, 1.0, 55.0 / 42800.0)
    assert found.regime == "atomisation"
    assert found.agreed


@pytest.mark.parametrize(
    ("speed", "regime", "agreed"),
    [
        (1.0, "dripping", True),
        (2.9, "dripping", False),  # We 6.9: Leib & Goldstein's inviscid limit is passed
        (12.0, "Rayleigh", True),
        (25.0, "first wind-induced", False),
        (60.0, "first wind-induced", True),
        (150.0, "second wind-induced", True),
        (250.0, "atomisation", True),
    ],
)
def test_a_water_jet_gets_faster(speed: float, regime: str, agreed: bool) -> None:
    found = jet.jet_regimes(*WATER, speed, 60e-6, AIR)
    assert (found.regime, found.agreed) == (regime, agreed)
    order = [jet.REGIMES.index(name) for name in (found.mildest, found.regime, found.strongest)]
    assert order == sorted(order)


@given(
    speed=st.floats(0.01, 500.0),
    diameter=st.floats(1e-6, 5e-3),
    viscosity=st.floats(1e-4, 10.0),
)
def test_faster_is_never_milder(speed: float, diameter: float, viscosity: float) -> None:
    found = jet.jet_regimes(998.2, viscosity, 0.0727, np.array([speed, 1.2 * speed]), diameter, AIR)
    for names in (found.regime, found.mildest, found.strongest):
        first, second = (jet.REGIMES.index(name) for name in names)
        assert first <= second
    assert (found.agreed == (found.mildest == found.strongest)).all()


def test_a_tube_brings_gravity_in() -> None:
    tube = {"nozzle_diameter": 2e-3, "outer_diameter": 2.4e-3}
    # The same diameter for the jet: 0.35 m/s is We 3.4, less than 8 and more than gravity asks for.
    found = jet.jet_regimes(*WATER, 0.35, 2e-3, AIR, **tube)
    criterion = found.criteria[0]
    assert criterion.source == "ClanetLasheras1999"
    assert criterion.value == pytest.approx(3.364, abs=2e-3)
    assert criterion.limit == pytest.approx(jet.jetting_weber_gravity(998.2, 0.0727, 2e-3, 2.4e-3))
    assert (found.regime, found.mildest) == ("Rayleigh", "dripping")
    assert jet.jet_regimes(*WATER, 0.35, 2e-3, AIR).regime == "dripping"
    # A jet that has contracted runs faster than the liquid in the tube.
    thinner = jet.jet_regimes(*WATER, 0.35 * 4.0, 1e-3, AIR, **tube)
    assert thinner.criteria[0].value == pytest.approx(criterion.value, rel=1e-12)


def test_arrays_agree_with_single_jets() -> None:
    speeds = np.array([[1.0, 12.0], [30.0, np.nan]])
    found = jet.jet_regimes(*WATER, speeds, 60e-6, AIR)
    assert found.regime.shape == (2, 2)
    for index in ((0, 0), (0, 1), (1, 0)):
        one = jet.jet_regimes(*WATER, float(speeds[index]), 60e-6, AIR)
        assert (found.regime[index], found.mildest[index], found.strongest[index]) == (
            one.regime,
            one.mildest,
            one.strongest,
        )
        for many, single in zip(found.criteria, one.criteria, strict=True):
            assert many.verdict[index] == single.verdict
            assert many.margin[index] == pytest.approx(single.margin, rel=1e-12)
    assert found.regime[1, 1] == found.mildest[1, 1] == "unknown"
    assert str(found) == "regimes of 4 jets"
    table = found.table()
    assert table.shape[0] == 4
    assert table["regime"].tolist() == ["dripping", "Rayleigh", "first wind-induced", "unknown"]


def test_one_jet_as_a_table() -> None:
    found = jet.jet_regimes(*WATER, 30.0, 60e-6, AIR)
    table = found.table()
    assert table["source"].tolist() == [
        "LinReitz1998",
        "LeibGoldstein1986",
        "LinReitz1998",
        "SterlingSleicher1975",
        "LinReitz1998",
        "LinReitz1998",
    ]
    assert (table["margin"] == table["value"] / table["limit"]).all()
    for key in table["source"]:
        assert source(key).seen
    assert pickle.loads(pickle.dumps(found)) == found


def test_units_and_bad_input() -> None:
    found = jet.jet_regimes("998.2 kg/m3", "1 mPa*s", "72.7 mN/m", "12 m/s", "60 um", "1.2 kg/m3")
    assert found.regime == "Rayleigh"
    with pytest.raises(BadInput, match="one is missing"):
        jet.jet_regimes(*WATER, 12.0, 60e-6, AIR, nozzle_diameter=1e-4)
    with pytest.raises(BadInput, match="broadcast"):
        jet.jet_regimes(*WATER, np.ones(2), np.full(3, 60e-6), AIR)
    with pytest.raises(BadInput, match="broadcast"):
        jet.jet_regimes(998.2, np.full(2, 1e-3), 0.0727, 12.0, 60e-6, np.full(3, AIR))
    with pytest.raises(UnitError, match="velocity"):
        jet.jet_regimes(*WATER, "12 m", 60e-6, AIR)
    with pytest.raises(Unphysical, match="gas_density"):
        jet.jet_regimes(*WATER, 12.0, 60e-6, 0.0)
