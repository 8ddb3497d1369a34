"""Where the gas takes part in breakup: fixed Weber numbers of the gas, 0.4, 13 and 40.3."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = [
    "ATOMISATION_WEBER",
    "FIRST_WIND_WEBER",
    "SECOND_WIND_WEBER",
    "atomisation_velocity",
    "first_wind_velocity",
    "second_wind_velocity",
]

FIRST_WIND_WEBER: Final = 0.4
SECOND_WIND_WEBER: Final = 13.0
ATOMISATION_WEBER: Final = 40.3

MODEL: Final = Published(
    gives="speeds at which the gas begins to help, to strip, and to shatter a jet",
    holds="liquids more than 500 times as dense as the gas, long smooth nozzles; turbulence and cavitation "
    "in the nozzle shift the last two by a factor of several",
    sources=("LinReitz1998", "TrettelCompilation", "Trettel2020"),
    mark="S2",
    place="rho_g U^2 d/gamma = 0.4, 13, 40.3, as quoted from Reitz 1978 and Lin & Reitz 1998",
    agreement="230 jets with a compiler's label (by breakup length): Rayleigh 103 of 149 on the right "
    "side, first wind-induced 37 of 58, second 9 of 19, atomisation 4 of 4",
)


@physical(returns="velocity")
def first_wind_velocity(surface_tension: float, jet_diameter: float, gas_density: float) -> float:
    """Speed above which the gas takes part in the breakup of a jet: gas Weber number 0.4.

    Holds as a rule for jets in still gas; the end of the Rayleigh regime, in which drops are larger
    than the jet and the length to breakup grows with the speed. With the Ohnesorge number in it:
    `first_wind_velocity_viscous`, which allows 1.7 times this speed and more.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet [m].
    gas_density : float or array
        Density of the gas [kg/m3].

    Returns
    -------
    float or array
        Speed of the jet relative to the gas [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    jet_regimes : Every criterion side by side.

    Notes
    -----
    ``U = (0.4 gamma/(rho_g d))^(1/2)`` [S2]: Weber number on the diameter, of the GAS.

    References
    ----------
    S. P. Lin, R. D. Reitz, Annu. Rev. Fluid Mech. 30 (1998) 85.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.first_wind_velocity('72.7 mN/m', '60 um', '1.2 kg/m3'):.1f}")
    20.1 meter / second
    """
    return _speed(FIRST_WIND_WEBER, surface_tension, jet_diameter, gas_density)


@physical(returns="velocity")
def second_wind_velocity(surface_tension: float, jet_diameter: float, gas_density: float) -> float:
    """Speed above which the gas strips drops off a jet close to the nozzle: gas Weber number 13.

    Holds as a rule for jets in still gas from long smooth nozzles: drops far smaller than the jet
    come off its surface some way from the nozzle. Turbulence shifts it by a factor of several.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet [m].
    gas_density : float or array
        Density of the gas [kg/m3].

    Returns
    -------
    float or array
        Speed of the jet relative to the gas [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``U = (13 gamma/(rho_g d))^(1/2)`` [S2]: Weber number on the diameter, of the GAS.

    References
    ----------
    S. P. Lin, R. D. Reitz, Annu. Rev. Fluid Mech. 30 (1998) 85.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.second_wind_velocity('72.7 mN/m', '60 um', '1.2 kg/m3'):.0f}")
    115 meter / second
    """
    return _speed(SECOND_WIND_WEBER, surface_tension, jet_diameter, gas_density)


@physical(returns="velocity")
def atomisation_velocity(surface_tension: float, jet_diameter: float, gas_density: float) -> float:
    """Speed above which a jet atomises at the nozzle: gas Weber number 40.3.

    Holds as a rule for jets in still gas from long smooth nozzles. Turbulence and cavitation in the
    nozzle shift it by a factor of several.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet [m].
    gas_density : float or array
        Density of the gas [kg/m3].

    Returns
    -------
    float or array
        Speed of the jet relative to the gas [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``U = (40.3 gamma/(rho_g d))^(1/2)`` [S2]: Weber number on the diameter, of the GAS.

    References
    ----------
    S. P. Lin, R. D. Reitz, Annu. Rev. Fluid Mech. 30 (1998) 85.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.atomisation_velocity('72.7 mN/m', '60 um', '1.2 kg/m3'):.0f}")
    202 meter / second
    """
    return _speed(ATOMISATION_WEBER, surface_tension, jet_diameter, gas_density)


def _speed(weber: float, surface_tension: float, length: float, gas_density: float) -> float:
    found: float = (weber * surface_tension / (gas_density * length)) ** 0.5
    return found
