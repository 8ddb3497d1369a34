"""What dissolved coils do to a viscosity: intrinsic viscosities, and the laws over concentration."""

from __future__ import annotations

import math
from dataclasses import dataclass
from typing import Any, Final

import numpy as np

from dropkit.errors import BadInput
from dropkit.records import PropertyRecord

__all__ = ["SALT_LEEWAY", "Chain", "entry_chain", "entry_salts"]

# How far a salt concentration may be from a measured one.
SALT_LEEWAY: Final = 0.1


@dataclass(frozen=True, slots=True)
class Chain:
    """One polymer in one solvent: its intrinsic viscosity and its law over concentration.

    Parameters
    ----------
    intrinsic : float
        Intrinsic viscosity [m3/kg] where it was measured.
    law : str
        ``"huggins"``, ``"huggins_power"`` or ``"martin"``.
    constant, power : float
        Of the law [-]; `power` serves ``"huggins_power"`` alone.
    limit : float
        Largest c[eta] that was measured [-].
    cooling_factor, cooling_from : float
        Factor on the intrinsic viscosity for each 10 K below a temperature [K].
    """

    intrinsic: float
    law: str
    constant: float
    power: float
    limit: float
    cooling_factor: float = 1.0
    cooling_from: float = 298.15

    def intrinsic_at(self, temperature: Any) -> Any:
        """Intrinsic viscosity at temperatures.

        Parameters
        ----------
        temperature : float or ndarray
            Temperatures [K].

        Returns
        -------
        float or ndarray
            Intrinsic viscosity [m3/kg].
        """
        if self.cooling_factor == 1.0:
            return self.intrinsic + 0.0 * temperature
        return self.intrinsic * self.cooling_factor ** ((self.cooling_from - temperature) / 10.0)

    def relative(self, concentration: float, temperature: Any) -> Any:
        """Viscosity of the solution over that of the solvent.

        Parameters
        ----------
        concentration : float
            Mass of polymer in a volume of solution [kg/m3].
        temperature : float or ndarray
            Temperatures [K].

        Returns
        -------
        float or ndarray
            Relative viscosity [-].
        """
        x = concentration * self.intrinsic_at(temperature)
        if self.law == "martin":
            return 1.0 + x * np.exp(self.constant * x)
        return 1.0 + x + self._huggins(temperature) * x * x

    def steepness(self, concentration: float, temperature: Any) -> Any:
        """Relative change of the viscosity for a relative change of the intrinsic viscosity.

        Parameters
        ----------
        concentration : float
            Mass of polymer in a volume of solution [kg/m3].
        temperature : float or ndarray
            Temperatures [K].

        Returns
        -------
        float or ndarray
            Logarithmic slope [-].
        """
        x = concentration * self.intrinsic_at(temperature)
        if self.law == "martin":
            slope = x * (1.0 + self.constant * x) * np.exp(self.constant * x)
        else:
            slope = x + (2.0 + self.power) * self._huggins(temperature) * x * x
        return slope / self.relative(concentration, temperature)

    def _huggins(self, temperature: Any) -> Any:
        # The power was published with [eta] in dL/g.
        return self.constant * (10.0 * self.intrinsic_at(temperature)) ** self.power

    def describe(self) -> str:
        """The law in words.

        Returns
        -------
        str
            With its constant.
        """
        if self.law == "martin":
            return f"Martin's equation, constant {self.constant:.3g}"
        if self.law == "huggins":
            return f"Huggins' equation, constant {self.constant:.3g}"
        return f"Huggins' equation, constant {self.constant:.3g} ([eta] in dL/g)^{self.power:.2g}"


def entry_salts(entry: PropertyRecord) -> tuple[float, float]:
    """The salt concentrations [mol/m3] between which an entry serves."""
    stated = entry.parameters["salt_concentration"]
    return (1.0 - SALT_LEEWAY) * stated[0], (1.0 + SALT_LEEWAY) * stated[-1]


def entry_chain(
    entry: PropertyRecord, molar_mass: float | None, salt: float, intrinsic: float | None
) -> Chain:
    """The chain that an entry gives.

    Parameters
    ----------
    entry : PropertyRecord
        Of a thickener's record.
    molar_mass : float or None
        Molar mass [kg/mol]; a relation over molar mass needs it.
    salt : float
        Salt concentration [mol/m3], inside the entry's.
    intrinsic : float or None
        The user's own intrinsic viscosity [m3/kg] in place of the entry's.

    Returns
    -------
    Chain
        With its law.

    Raises
    ------
    BadInput
        If a relation over molar mass has none.
    """
    p = entry.parameters
    stated = p["salt_concentration"]
    own = intrinsic is not None
    if intrinsic is None:
        if entry.form == "sample":
            intrinsic = math.exp(_between(salt, stated, [math.log(v) for v in p["values"]]))
        elif molar_mass is None:
            raise BadInput(f"{entry.label} needs a molar mass", allowed="molar_mass='...'")
        else:
            # As published, relations take g/mol.
            intrinsic = p["unit"] * p["factor"] * (1000.0 * molar_mass) ** p["exponent"]
    return Chain(
        intrinsic=intrinsic,
        law=p["law"],
        constant=_between(salt, stated, p["constants"]),
        power=float(p.get("constant_exponent", 0.0)),
        limit=_between(salt, stated, p["limits"]),
        cooling_factor=1.0 if own else float(p.get("cooling_factor", 1.0)),
        cooling_from=float(p.get("cooling_from", 298.15)),
    )


def _between(salt: float, stated: Any, values: Any) -> float:
    """Linear in the logarithm of the salt concentration; held at the ends."""
    if len(stated) == 1:
        return float(values[0])
    return float(np.interp(math.log(max(salt, 1e-9)), np.log(stated), values))
