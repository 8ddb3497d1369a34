"""Salts in a solvent: what a dissolved salt does to density, viscosity and surface tension.

The published forms are written for water. Here they act on the value of the solvent at
hand, so that water comes out as published and other solvents as an estimate.

References
----------
M. Laliberte, J. Chem. Eng. Data 54 (2009) 1725-1760 (density and viscosity).
C. S. Dutcher, A. S. Wexler, S. L. Clegg, J. Phys. Chem. A 114 (2010) 12216-12230
(surface tension).
"""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any

import numpy as np

__all__ = ["apparent_density", "apparent_viscosity", "surface_tension_ratio"]


def apparent_density(parameters: Mapping[str, Any], solute: Any, temperature: Any) -> Any:
    """Laliberte's apparent density of the salt [kg/m3].

    Parameters
    ----------
    parameters : mapping
        ``c0`` to ``c4`` as published.
    solute : float or ndarray
        Mass fraction of all solutes.
    temperature : float or ndarray
        Temperature [K].
    """
    c0, c1, c2, c3, c4 = (parameters[f"c{i}"] for i in range(5))
    celsius = temperature - 273.15
    return (c0 * solute + c1) * np.exp(1e-6 * (celsius + c4) ** 2) / (solute + c2 + c3 * celsius)


def apparent_viscosity(parameters: Mapping[str, Any], solute: Any, temperature: Any) -> Any:
    """Laliberte's apparent viscosity of the salt [Pa*s].

    Parameters
    ----------
    parameters : mapping
        ``v1`` to ``v6`` as published (they give mPa*s).
    solute : float or ndarray
        Mass fraction of all solutes.
    temperature : float or ndarray
        Temperature [K].
    """
    v1, v2, v3, v4, v5, v6 = (parameters[f"v{i}"] for i in range(1, 7))
    celsius = temperature - 273.15
    return 1e-3 * np.exp((v1 * solute**v2 + v3) / (v4 * celsius + 1.0)) / (v5 * solute**v6 + 1.0)


def surface_tension_ratio(
    parameters: Mapping[str, Any], mole_fraction: Any, water: Any, temperature: Any
) -> Any:
    """Dutcher's surface tension of the solution over that of water [-].

    Parameters
    ----------
    parameters : mapping
        ``c1, c2, a_ws, b_ws, a_sw, b_sw`` as published (for mN/m).
    mole_fraction : float or ndarray
        Of the salt, counted as one unit, not as ions.
    water : float or ndarray
        Surface tension of water [N/m].
    temperature : float or ndarray
        Temperature [K].
    """
    c1, c2, a_ws, b_ws, a_sw, b_sw = (
        parameters[name] for name in ("c1", "c2", "a_ws", "b_ws", "a_sw", "b_sw")
    )
    milli = 1e3 * water
    rest = 1.0 - mole_fraction
    salt = c1 + c2 * temperature
    logarithm = rest * np.log(milli + (a_ws + b_ws * temperature) * mole_fraction)
    logarithm = logarithm + mole_fraction * np.log(salt + (a_sw + b_sw * temperature) * rest)
    return np.exp(logarithm) / milli
