"""Breakup length of a jet that nothing disturbs but the heat in it: Kooij et al. 2024."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["thermal_breakup_length"]

WEBER: Final = Range(2.0, 5060.0, "the Weber number of the liquid on the jet diameter", "")
OHNESORGE: Final = Range(0.0, 0.64, "the Ohnesorge number on the jet diameter", "")
_BOLTZMANN: Final = 1.380649e-23  # J/K, exact by definition of the kelvin

MODEL: Final = Published(
    gives="breakup length of a jet without drive whose only disturbance is thermal",
    holds="Rayleigh breakup in still gas, a smooth entry without vibration or turbulence",
    sources=("Kooij2024", "Weber1931", "TrettelCompilation"),
    mark="C",
    place="L = U ln(a/eps0)/w, eps0 = (k_B T/gamma)^(1/2)",
    ranges=(WEBER, OHNESORGE),
    agreement="measured over formula, mean ratio, 178 Rayleigh rows: Sterling 1969, sharp orifice, "
    "0.97; Arai 1985 1.08; Grant 1965, thin liquids 1.15, viscous 0.67 to 0.78; Phinney "
    "1970 0.55 to 0.58, and 1.26 from one tube; Mansour 1994 0.33 and 0.64; all 0.71, rms of "
    "ln 0.56",
)


@physical(returns="distance", velocity="velocity > 0")
def thermal_breakup_length(
    density: float,
    viscosity: float,
    surface_tension: float,
    temperature: float,
    velocity: float,
    jet_diameter: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Breakup length of a jet that nothing disturbs but thermal motion.

    Holds where neither pump, nozzle nor room disturbs the jet more: near an upper end of what
    natural jets reach. A rival of `natural_breakup_length`, without a fitted constant.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    temperature : float or array
        Temperature of the liquid [K].
    velocity : float or array
        Speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside Weber numbers of 2 to 5060 and Ohnesorge numbers up to 0.64.

    Returns
    -------
    float or array
        The breakup length [m].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``L/d = ln(a/eps0) sqrt(We) (1 + 3 Oh)`` with ``eps0 = (k_B T/gamma)^(1/2)``, 0.24 nm for water
    [C]. That thermal waves start the breakup, "of the order of an angstrom", whatever the nozzle,
    is Kooij et al.'s finding [S, abstract]; their formula was not seen, this one is the plain
    estimate. Older measurements agree for a sharp orifice and disagree for most tubes.

    References
    ----------
    S. Kooij et al., What determines the breakup length of a jet? arXiv 2412.15974 (2024).
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> water = ("998 kg/m3", "1 mPa*s", "72.7 mN/m", "20 degC")
    >>> print(f"{jet.thermal_breakup_length(*water, '10 m/s', '60 um'):.2f}")
    6.69 millimeter
    """
    weber: Any = density * velocity * velocity * jet_diameter / surface_tension
    ohnesorge: Any = viscosity / (density * surface_tension * jet_diameter) ** 0.5
    mask = outside_mask("thermal_breakup_length", outside, (weber, WEBER), (ohnesorge, OHNESORGE))
    ratio: Any = 0.25 * jet_diameter * jet_diameter * surface_tension / (_BOLTZMANN * temperature)
    folds: Any
    if isinstance(ratio, np.ndarray):
        folds = np.where(ratio > 1.0, 0.5 * np.log(ratio), np.nan)
    else:
        folds = 0.5 * math.log(ratio) if ratio > 1.0 else math.nan
    length = folds * jet_diameter * weber**0.5 * (1.0 + 3.0 * ohnesorge)
    result: float = blank_outside(length, mask)
    return result
