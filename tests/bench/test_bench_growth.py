"""A million growth rates of the full viscous relation beside scipy's scalar root finder and Newton.

Run with ``python -m pytest tests/bench --benchmark-only``; ordinary runs skip these.
"""

from __future__ import annotations

from typing import Any

import numpy as np
import pytest
from bench_growth import newton, points, scalar_roots

from dropkit.models import jet

MILLION = 1_000_000
FEW = 500


@pytest.mark.benchmark(group="1e6 growth rates, full viscous relation")
@pytest.mark.parametrize("whose", ["dropkit", "plain vectorised Newton"])
def test_a_million_growth_rates(benchmark: Any, whose: str) -> None:
    x, oh = points(MILLION)
    calls = {"dropkit": jet.reduced_growth_viscous_full, "plain vectorised Newton": newton}
    answer = benchmark(calls[whose], x, oh)
    assert np.allclose(answer[:FEW], scalar_roots(x[:FEW], oh[:FEW]), rtol=1e-6)


@pytest.mark.benchmark(group="500 growth rates, full viscous relation")
@pytest.mark.parametrize("whose", ["dropkit", "dropkit, one by one", "scipy, one by one"])
def test_a_few_growth_rates(benchmark: Any, whose: str) -> None:
    x, oh = points(FEW)

    def singly(x: Any, oh: Any) -> Any:
        pairs = zip(x.tolist(), oh.tolist(), strict=True)
        return np.array([jet.reduced_growth_viscous_full(one, thick) for one, thick in pairs])

    calls = {
        "dropkit": jet.reduced_growth_viscous_full,
        "dropkit, one by one": singly,
        "scipy, one by one": scalar_roots,
    }
    answer = benchmark(calls[whose], x, oh)
    assert np.allclose(answer, scalar_roots(x, oh), rtol=1e-10)


@pytest.mark.benchmark(group="1e5 Ohnesorge numbers")
@pytest.mark.parametrize("what", ["fastest wave", "band of 0.8", "threshold of dripping"])
def test_what_a_design_asks(benchmark: Any, what: str) -> None:
    _, oh = points(100_000)
    calls = {
        "fastest wave": jet.most_unstable_wavelength_viscous_full,
        "band of 0.8": lambda *liquid: jet.growth_band_viscous_full(*liquid).longest,
        "threshold of dripping": jet.absolute_instability_velocity_viscous,
    }
    assert np.isfinite(benchmark(calls[what], 1.0, oh, 1.0, 2.0)).all()
