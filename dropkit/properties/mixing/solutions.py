"""Solids dissolved in a liquid by a polynomial: sugars, urea, and salts by other forms than Laliberte's.

One form serves every property. With y0 the solvent's own value and x the fraction of the
solute (its mass or mole fraction in the solution),

    P = sum_i x^i sum_j c_ij th^j,  i from 1,  th = (T - centre)/scale,

and the solution has y = y0 + P (`linear`), y = y0 (1 + P) (`ratio`) or y = y0 exp(P)
(`log`). Without solute it gives the solvent exactly.
"""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

__all__ = ["CENTRE", "SCALE", "TRANSFORMS", "dissolved", "polynomial", "solute_fraction"]

TRANSFORMS: Final = ("linear", "ratio", "log")
CENTRE: Final = 298.15  # K
SCALE: Final = 100.0  # K


def solute_fraction(basis: str, mass: Any, solute_molar_mass: float, moles_of_solvent: Any) -> Any:
    """The fraction that the polynomial takes, from the solute's mass fraction.

    Parameters
    ----------
    basis : {"mass", "mole"}
        Of the record.
    mass : float or ndarray
        Mass fraction of the solute.
    solute_molar_mass : float
        Molar mass of the solute [kg/mol].
    moles_of_solvent : float or ndarray
        Amount of solvent in 1 kg of solution [mol].
    """
    if basis == "mass":
        return mass
    moles = mass / solute_molar_mass
    return moles / (moles + moles_of_solvent)


def polynomial(parameters: Mapping[str, Any], fraction: Any, temperature: Any) -> Any:
    """The sum P of the form.

    Parameters
    ----------
    parameters : mapping
        ``coefficients`` (rows: powers of the fraction from 1; columns: powers of th from 0)
        and, where they differ from 298.15 K and 100 K, ``centre`` and ``scale``.
    fraction : float or ndarray
        On the record's basis.
    temperature : float or ndarray
        Temperature [K].
    """
    centre = float(parameters.get("centre", CENTRE))
    th = (temperature - centre) / float(parameters.get("scale", SCALE))
    total: Any = 0.0
    for row in reversed(parameters["coefficients"]):
        inner: Any = 0.0
        for coefficient in reversed(row):
            inner = inner * th + coefficient
        total = (total + inner) * fraction
    return total


def dissolved(parameters: Mapping[str, Any], solvent: Any, fraction: Any, temperature: Any) -> Any:
    """Value of the solution [SI].

    Parameters
    ----------
    parameters : mapping
        ``transform`` and what `polynomial` takes.
    solvent : float or ndarray
        The solvent's own value [SI].
    fraction : float or ndarray
        On the record's basis.
    temperature : float or ndarray
        Temperature [K].
    """
    change = polynomial(parameters, fraction, temperature)
    transform = parameters["transform"]
    if transform == "log":
        return solvent * np.exp(change)
    return solvent + change if transform == "linear" else solvent * (1.0 + change)
