"""Flash boiling at the outlet: a liquid above its boiling point is no jet of the theories here."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.errors import BadInput, OutOfRange
from dropkit.models.published import Published, blank_outside
from dropkit.validity import Outside, Range, check_outside, settle

__all__ = ["OutletSuperheat", "outlet_superheat", "superheat_ratio"]

BOILING: Final = Range(0.0, 1.0, "the vapour pressure over the ambient pressure", "")
_HINT: Final = (
    "The liquid boils as it leaves (flash boiling): growth, breakup length and drop size of jets do "
    "not hold. Cool it, or raise the ambient pressure above its vapour pressure"
)

MODEL: Final = Published(
    gives="whether a liquid boils as it leaves the nozzle, so that theories of jets do not hold",
    holds="any liquid with a vapour pressure; dissolved gas, which can foam below it, is left out. A "
    "few kelvin of superheat may pass unseen: flashing bursts of jets are told from 5 to 15 K on",
    sources=("Harpole2018",),
    mark="C",
    place="p_v(T)/p_ambient > 1",
    ranges=(BOILING,),
    agreement="the boiling point by definition; at what superheat a jet bursts was not found in "
    "numbers that a liquid's properties give",
)


@physical(returns="ratio")
def superheat_ratio(
    vapour_pressure: float, ambient_pressure: float, *, outside: Outside = "raise"
) -> float:
    """Vapour pressure of the liquid over the pressure around the outlet; refused above 1.

    Holds for any liquid. Above 1 the liquid is above its boiling point at that pressure, as every
    propellant is in the open air, and boils as it leaves: no theory of jets here holds then.

    Parameters
    ----------
    vapour_pressure : float or array
        Vapour pressure of the liquid at its temperature in the nozzle [Pa].
    ambient_pressure : float or array
        Pressure around the outlet, above vacuum [Pa].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above 1.

    Returns
    -------
    float or array
        The ratio [-].

    Raises
    ------
    OutOfRange
        Where the liquid boils, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    outlet_superheat : The same for a liquid of the library.

    Notes
    -----
    ``p_v/p_a`` [C]. Jets are told to burst from 5 to 15 K of superheat on [S2]; between the boiling
    point and that they may still look like jets.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> round(jet.superheat_ratio("2.34 kPa", "1 atm"), 3)
    0.023
    """
    check_outside(outside)
    ratio: Any = vapour_pressure / ambient_pressure
    mask = settle("superheat_ratio", ratio, BOILING, outside, hint=_HINT)
    result: float = blank_outside(ratio, mask)
    return result


@dataclass(frozen=True, slots=True)
class OutletSuperheat:
    """Whether a liquid boils as it leaves a nozzle.

    Parameters
    ----------
    name : str
        The liquid.
    ratio : float or array
        Vapour pressure over ambient pressure [-].
    boils : bool or array of bool
        Where the ratio is above 1.

    Examples
    --------
    >>> import dropkit as dk
    >>> print(dk.models.jet.outlet_superheat(dk.liquid("propane"), "20 degC"))
    propane boils as it leaves (vapour pressure 8.26 times the ambient): jet theory refused
    """

    name: str
    ratio: Any
    boils: Any

    def refuse(self) -> None:
        """Raise OutOfRange where the liquid boils as it leaves.

        Raises
        ------
        OutOfRange
            Naming the liquid and what to do.
        """
        if bool(np.any(self.boils)):
            raise OutOfRange(str(self), allowed="a vapour pressure below the ambient", hint=_HINT)

    def __str__(self) -> str:
        worst = float(np.nanmax(self.ratio)) if np.any(~np.isnan(self.ratio)) else float("nan")
        said = f"(vapour pressure {worst:.3g} times the ambient)"
        count = int(np.count_nonzero(self.boils))
        if not count:
            return f"{self.name} does not boil as it leaves {said}"
        where = "" if np.ndim(self.boils) == 0 else f" in {count} of {np.size(self.boils)} cases"
        return f"{self.name} boils as it leaves{where} {said}: jet theory refused"


def outlet_superheat(
    fluid: Any, temperature: Any, ambient_pressure: Any = 101325.0
) -> OutletSuperheat:
    """Whether a liquid boils as it leaves a nozzle, so that the theories of jets are refused.

    Holds for liquids, and for mixtures and fluids of one's own that were given a vapour pressure: none
    is predicted for them. A verdict; its method ``refuse()`` raises where it boils.

    Parameters
    ----------
    fluid : Liquid, Mixture or Fluid
        What flows out; anything with a method ``vapour_pressure(temperature)``.
    temperature : float, array or quantity
        Temperature in the nozzle [K].
    ambient_pressure : float, array or quantity
        Pressure around the outlet, above vacuum [Pa]; one atmosphere by default.

    Returns
    -------
    OutletSuperheat
        The verdict.

    Raises
    ------
    BadInput
        For what has no vapour pressure.
    MissingProperty, OutOfRange
        Where the fluid's vapour pressure is not known at that temperature.
    UnitError, Unphysical
        A pressure of another dimension, or impossible.

    Examples
    --------
    >>> import dropkit as dk
    >>> verdict = dk.models.jet.outlet_superheat(dk.liquid("water"), "90 degC")
    >>> bool(verdict.boils), round(verdict.ratio, 2)
    (False, 0.69)
    """
    ask = getattr(fluid, "vapour_pressure", None)
    if not callable(ask):
        raise BadInput(
            f"a {type(fluid).__name__} has no vapour pressure to ask for",
            allowed="a liquid, a mixture or a fluid",
            hint="superheat_ratio(vapour_pressure, ambient_pressure) takes the pressures themselves",
        )
    pressure = ask(temperature)
    ratio = superheat_ratio(pressure, ambient_pressure, outside="allow")
    boils = ratio > BOILING.high
    name = str(getattr(fluid, "name", "") or getattr(fluid, "label", "") or "the fluid")
    return OutletSuperheat(name, ratio, boils if isinstance(boils, np.ndarray) else bool(boils))
