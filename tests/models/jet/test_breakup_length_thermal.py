"""Jets that only heat disturbs: closed values, and measured lengths study by study [S2]."""

from __future__ import annotations

import math

import numpy as np
import pytest

from dropkit.errors import DropkitWarning, OutOfRange
from dropkit.models import jet
from dropkit.published_rows import published_file
from dropkit.records import data_dir


def ratios(*studies: str, tube: str | None = None) -> np.ndarray:
    """Measured over calculated length of Rayleigh rows, at 298 K."""
    found = []
    for study in studies:
        for row in published_file(data_dir() / "published" / "jets" / f"{study}.csv"):
            if row["regime"] != "Rayleigh" or tube not in (None, row["nozzle_L_over_d"]):
                continue
            words = ("density_kg_m3", "viscosity_Pa_s", "surface_tension_N_m")
            liquid = [float(row[word]) for word in words]
            d = float(row["jet_diameter_m"])
            model = jet.thermal_breakup_length(*liquid, 298.0, float(row["speed_m_s"]), d)
            found.append(float(row["breakup_length_over_d"]) * d / model)
    return np.array(found)


def test_the_start_is_the_thermal_length() -> None:
    # (1.380649e-23 x 293.15/0.0727)^(1/2) = 0.2359 nm for water
    water, d = (998.2, 1.0e-3, 0.0727), 60e-6
    growth = jet.maximum_growth_viscous_longwave(*water, d)
    found = jet.thermal_breakup_length(*water, 293.15, 10.0, d)
    start = jet.radius_amplitude_from_breakup_length(10.0, d, growth, found)
    assert start == pytest.approx(0.23595e-9, rel=1e-4)


@pytest.mark.parametrize(
    ("studies", "tube", "count", "bias"),
    [
        (("Sterling1969",), "0.25", 13, 0.97),
        (("Sterling1969",), "49", 10, 0.83),
        (("Arai1985",), None, 5, 1.08),
        (("Grant1965", "Grant1965_tables"), "148", 11, 1.13),
        (("Grant1965", "Grant1965_tables"), "102", 6, 0.74),
        (("Phinney1970",), "142.8", 24, 0.55),
        (("Phinney1970",), "2208", 8, 1.26),
        (("Mansour1994",), "255", 32, 0.64),
        (("Mansour1994",), "36", 5, 0.33),
    ],
)
def test_study_by_study(
    studies: tuple[str, ...], tube: str | None, count: int, bias: float
) -> None:
    found = np.log(ratios(*studies, tube=tube))
    assert found.size == count
    assert np.exp(found.mean()) == pytest.approx(bias, abs=0.01)


def test_all_rows_that_state_their_liquid() -> None:
    studies = ("Arai1985", "Grant1965", "Grant1965_tables", "Mansour1994", "Phinney1970")
    found = np.log(ratios(*studies, "Sterling1969"))
    assert found.size == 178
    assert np.exp(found.mean()) == pytest.approx(0.71, abs=0.01)
    assert np.sqrt((found**2).mean()) == pytest.approx(0.556, abs=0.001)


def test_hotter_starts_higher_and_nothing_below_the_thermal_length() -> None:
    case = (1000.0, 1e-3, 0.05)
    cold, hot = (jet.thermal_breakup_length(*case, t, 5.0, 1e-4) for t in (280.0, 360.0))
    assert hot < cold
    # ln(T) enters by half: 0.5 ln(360/280) of growth
    growth = jet.maximum_growth_viscous_longwave(*case, 1e-4)
    assert cold - hot == pytest.approx(5.0 / growth * 0.5 * math.log(360.0 / 280.0), rel=1e-9)
    with pytest.warns(DropkitWarning, match="no finite value"):
        found = jet.thermal_breakup_length(*case, 300.0, 500.0, 5e-10, outside="allow")
    assert math.isnan(found)
    with pytest.raises(OutOfRange, match="Ohnesorge"):
        jet.thermal_breakup_length(1000.0, 1.0, 0.05, 300.0, 5.0, 1e-4)
