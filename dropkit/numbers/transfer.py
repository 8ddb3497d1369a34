"""Numbers of heat and mass transfer at a surface: dimensionless coefficients and fluxes."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = [
    "biot",
    "jakob",
    "nusselt",
    "sherwood",
    "spalding_heat",
    "spalding_mass",
    "stefan",
]


@physical(returns="ratio")
def sherwood(diffusivity: float, mass_transfer_coefficient: float, length: float) -> float:
    """Sherwood number Sh: mass transfer by all means against still diffusion.

    2 for a sphere in a still gas, on its diameter.

    Parameters
    ----------
    diffusivity : float or array
        Diffusivity of the vapour in the gas [m2/s].
    mass_transfer_coefficient : float or array
        Mass transfer coefficient [m/s].
    length : float or array
        Diameter of the drop [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    nusselt : The same for heat.

    Notes
    -----
    ``Sh = k_m d / D``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.sherwood(2.5e-5, 0.5, "100 um"), 9)
    2.0
    """
    return mass_transfer_coefficient * length / diffusivity


@physical(returns="ratio")
def nusselt(thermal_conductivity: float, heat_transfer_coefficient: float, length: float) -> float:
    """Nusselt number Nu: heat transfer by all means against conduction in the fluid at rest.

    2 for a sphere in a still gas, on its diameter.

    Parameters
    ----------
    thermal_conductivity : float or array
        Thermal conductivity of the FLUID outside the surface [W/(m*K)].
    heat_transfer_coefficient : float or array
        Heat transfer coefficient [W/(m2*K)].
    length : float or array
        Diameter of the drop or jet [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    biot : The same expression with the conductivity of the body.

    Notes
    -----
    ``Nu = h d / k``, with the fluid's ``k``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.nusselt(0.026, 520.0, "100 um"), 9)
    2.0
    """
    return heat_transfer_coefficient * length / thermal_conductivity


@physical(returns="ratio")
def biot(thermal_conductivity: float, heat_transfer_coefficient: float, length: float) -> float:
    """Biot number Bi: heat transfer at the surface against conduction inside the body.

    Far below 1 the body has one temperature.

    Parameters
    ----------
    thermal_conductivity : float or array
        Thermal conductivity of the BODY, the drop itself [W/(m*K)].
    heat_transfer_coefficient : float or array
        Heat transfer coefficient at its surface [W/(m2*K)].
    length : float or array
        Diameter of the drop or jet [m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    nusselt : The same expression with the conductivity of the fluid outside.

    Notes
    -----
    ``Bi = h d / k``, with the body's ``k``. The rule "one temperature below 0.1" is for volume
    over surface, a sixth of the diameter of a drop: on the diameter it is 0.6.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.biot(0.6, 520.0, "100 um"), 4)
    0.0867
    """
    return heat_transfer_coefficient * length / thermal_conductivity


@physical(
    returns="ratio",
    surface_mass_fraction="mass_fraction",
    far_mass_fraction="mass_fraction",
)
def spalding_mass(surface_mass_fraction: float, far_mass_fraction: float = 0.0) -> float:
    """Spalding mass number B_M: excess of vapour at the surface against the gas there.

    Drives evaporation: the rate goes as ``ln(1 + B_M)``. Holds for one vapour in a gas that
    doesn't dissolve in the liquid.

    Parameters
    ----------
    surface_mass_fraction : float or array
        Mass fraction of vapour in the gas at the surface of the drop [0..1].
    far_mass_fraction : float or array
        Mass fraction of vapour far from the drop [0..1].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments; negative while vapour condenses, NaN
        at the boiling point, where the mass fraction at the surface is 1.

    Raises
    ------
    UnitError, Unphysical
        A fraction outside 0 to 1.

    See Also
    --------
    spalding_heat : The same from the heat that the gas brings.

    Notes
    -----
    ``B_M = (Y_s - Y_inf) / (1 - Y_s)``, of MASS fractions, not of mole fractions.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.spalding_mass(0.5, 0.0), 9)
    1.0
    """
    return (surface_mass_fraction - far_mass_fraction) / (1.0 - surface_mass_fraction)


@physical(returns="ratio", vapour_heat_capacity="heat_capacity")
def spalding_heat(
    heat_of_vaporisation: float, vapour_heat_capacity: float, temperature_difference: float
) -> float:
    """Spalding heat number B_T: heat that the hotter gas holds against the heat of vaporisation.

    Drives evaporation in a hot gas, without radiation and once the drop has stopped warming up.

    Parameters
    ----------
    heat_of_vaporisation : float or array
        Heat of vaporisation at the temperature of the surface [J/kg].
    vapour_heat_capacity : float or array
        Heat capacity of the VAPOUR at constant pressure, in the film around the drop [J/(kg*K)].
    temperature_difference : float or array
        Temperature of the gas far away less that of the surface of the drop [K].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments; negative in a colder gas.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    spalding_mass : The same from the vapour at the surface.

    Notes
    -----
    ``B_T = c_pv (T_inf - T_s) / h_v``. The heat capacity is the vapour's, not the liquid's and
    not the gas's.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.spalding_heat(2.4e6, 1900.0, 460.0), 4)
    0.3642
    """
    return vapour_heat_capacity * temperature_difference / heat_of_vaporisation


@physical(returns="ratio")
def jakob(
    heat_of_vaporisation: float, heat_capacity: float, temperature_difference: float
) -> float:
    """Jakob number Ja: sensible heat of a superheated liquid against the heat of vaporisation.

    Parameters
    ----------
    heat_of_vaporisation : float or array
        Heat of vaporisation [J/kg].
    heat_capacity : float or array
        Heat capacity of the liquid [J/(kg*K)].
    temperature_difference : float or array
        Temperature of the heated wall, or of the liquid, less the boiling temperature [K].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments; negative below the boiling point.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    stefan : The same for freezing.

    Notes
    -----
    ``Ja = c_p (T_w - T_b) / h_v``. Work on growing bubbles multiplies it by the ratio of the
    densities of liquid and vapour: some hundred to thousand times this number.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.jakob(2e6, 4000.0, 10.0), 9)
    0.02
    """
    return heat_capacity * temperature_difference / heat_of_vaporisation


@physical(returns="ratio", heat_of_fusion="heat_of_vaporisation")
def stefan(heat_of_fusion: float, heat_capacity: float, temperature_difference: float) -> float:
    """Stefan number Ste: sensible heat down to a cold wall against the heat of fusion.

    How readily a drop of melt freezes on what it hits.

    Parameters
    ----------
    heat_of_fusion : float or array
        Heat of fusion [J/kg].
    heat_capacity : float or array
        Heat capacity of the SOLID that forms [J/(kg*K)].
    temperature_difference : float or array
        Melting temperature less that of the wall [K].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments; negative for a wall that melts it.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    jakob : The same for boiling.

    Notes
    -----
    ``Ste = c_p (T_m - T_w) / h_f``. Some authors take the heat capacity of the liquid, and some
    the temperature of the drop above melting: say which.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.stefan("80 kJ/kg", 400.0, 100.0), 9)
    0.5
    """
    return heat_capacity * temperature_difference / heat_of_fusion
