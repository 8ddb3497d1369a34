"""Where the gas takes part in breakup, with the liquid's viscosity: Sterling & Sleicher."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["first_wind_velocity_viscous", "first_wind_weber_viscous"]

DENSITIES: Final = Range(500.0, float("inf"), "density over gas_density", "")

MODEL: Final = Published(
    gives="gas Weber number and speed at which the gas begins to take part in breakup",
    holds="liquids more than 500 times as dense as the gas, long smooth nozzles, still gas",
    sources=("SterlingSleicher1975", "LinReitz1998", "TrettelCompilation"),
    mark="S2",
    place="We_g = 1.2 + 3.41 Oh^0.9",
    ranges=(DENSITIES,),
    agreement="230 jets with a compiler's label (by breakup length): Rayleigh 137 of 149 on the right "
    "side, first wind-induced 25 of 58; with 0.4 in its place 103 and 37",
)


@physical(returns="ratio")
def first_wind_weber_viscous(
    density: float, viscosity: float, surface_tension: float, jet_diameter: float
) -> float:
    """Gas Weber number at which the gas begins to take part in the breakup of a viscous jet.

    Holds for jets in still gas of less than 1/500 of the liquid's density, from long smooth nozzles.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet [m].

    Returns
    -------
    float or array
        The gas Weber number on the diameter [-].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``We_g = 1.2 + 3.41 Oh^0.9`` [S2], both on the diameter.

    References
    ----------
    A. M. Sterling, C. A. Sleicher, J. Fluid Mech. 68 (1975) 477, doi:10.1017/S0022112075001772.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> round(jet.first_wind_weber_viscous(1000.0, 6e-3, 0.06, 60e-6), 3)
    1.629
    """
    ohnesorge: Any = viscosity / (density * surface_tension * jet_diameter) ** 0.5
    found: float = 1.2 + 3.41 * ohnesorge**0.9
    return found


@physical(returns="velocity")
def first_wind_velocity_viscous(
    density: float,
    viscosity: float,
    surface_tension: float,
    jet_diameter: float,
    gas_density: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Speed above which the gas takes part in the breakup of a viscous jet.

    Holds for jets in still gas of less than 1/500 of the liquid's density, from long smooth nozzles.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet [m].
    gas_density : float or array
        Density of the gas [kg/m3].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens in a gas of more than 1/500 of the liquid's density.

    Returns
    -------
    float or array
        Speed of the jet relative to the gas [m/s].

    Raises
    ------
    OutOfRange
        In a denser gas, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``U = (We_g gamma/(rho_g d))^(1/2)``, with We_g of `first_wind_weber_viscous`.

    References
    ----------
    A. M. Sterling, C. A. Sleicher, J. Fluid Mech. 68 (1975) 477, doi:10.1017/S0022112075001772.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.first_wind_velocity_viscous(998.0, 1e-3, 0.0727, 60e-6, 1.2):.1f}")
    35.9
    """
    mask = outside_mask("first_wind_velocity_viscous", outside, (density / gas_density, DENSITIES))
    weber: Any = first_wind_weber_viscous.si(density, viscosity, surface_tension, jet_diameter)
    speed = (weber * surface_tension / (gas_density * jet_diameter)) ** 0.5
    result: float = blank_outside(speed, mask)
    return result
