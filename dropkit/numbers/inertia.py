"""Numbers that compare the inertia of a flow with friction, weight, time and pressure."""

from __future__ import annotations

import math

from dropkit.boundary import physical

__all__ = [
    "cavitation_number",
    "discharge_coefficient",
    "froude",
    "gas_reynolds",
    "reynolds",
    "reynolds_radius",
    "strouhal",
]


@physical(returns="ratio", velocity="velocity >= 0")
def reynolds(density: float, viscosity: float, velocity: float, length: float) -> float:
    """Reynolds number Re: inertia of the liquid against its viscosity.

    Holds for any Newtonian flow with one speed and one length.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    velocity : float or array
        Speed of the liquid [m/s].
    length : float or array
        Diameter of the jet, drop or nozzle [m].

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
    reynolds_radius : Half of this, on the radius.
    gas_reynolds : The Reynolds number of a drop in flight, with the properties of the gas.

    Notes
    -----
    ``Re = rho U d / mu``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.reynolds(1000.0, 0.010, 6.0, "30 um"), 6)
    18.0
    """
    return density * velocity * length / viscosity


@physical(returns="ratio", velocity="velocity >= 0")
def reynolds_radius(density: float, viscosity: float, velocity: float, radius: float) -> float:
    """Reynolds number Re_a: inertia of the liquid against its viscosity, on the radius.

    Half of the number on the diameter.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    velocity : float or array
        Speed of the liquid [m/s].
    radius : float or array
        Radius of the jet, drop or nozzle [m].

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
    reynolds : The number on the diameter.

    Notes
    -----
    ``Re_a = rho U a / mu = Re / 2``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.reynolds_radius(1000.0, 0.010, 6.0, "15 um"), 6)
    9.0
    """
    return density * velocity * radius / viscosity


@physical(returns="ratio", velocity="velocity >= 0")
def gas_reynolds(velocity: float, length: float, gas_density: float, gas_viscosity: float) -> float:
    """Reynolds number of the gas Re_g: inertia of the gas around a drop against its viscosity.

    The number that drag and transfer laws of drops in flight are written in.

    Parameters
    ----------
    velocity : float or array
        Speed of the drop relative to the gas [m/s].
    length : float or array
        Diameter of the drop [m].
    gas_density : float or array
        Density of the gas [kg/m3].
    gas_viscosity : float or array
        Dynamic viscosity of the gas [Pa*s].

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
    reynolds : The number with the properties of the liquid.

    Notes
    -----
    ``Re_g = rho_g U d / mu_g``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.gas_reynolds(4.03, "1 mm", 1.205, 1.81e-5), 1)
    268.3
    """
    return gas_density * velocity * length / gas_viscosity


@physical(returns="ratio", velocity="velocity >= 0", gravity="acceleration > 0")
def froude(velocity: float, length: float, gravity: float = 9.80665) -> float:
    """Froude number Fr: inertia against weight, as a ratio of speeds.

    Parameters
    ----------
    velocity : float or array
        Speed [m/s].
    length : float or array
        Diameter of the jet or drop, or the height of a fall where that is meant [m].
    gravity : float or array
        Acceleration of gravity [m/s2].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Fr = U / (g L)^(1/2)``. Some authors call the square of this the Froude number.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.froude(1.83, 2.0, gravity=1.63), 6)
    1.013543
    """
    number: float = velocity / (gravity * length) ** 0.5
    return number


@physical(returns="ratio", velocity="velocity > 0")
def strouhal(velocity: float, length: float, frequency: float) -> float:
    """Strouhal number St: time of passage against the period of a vibration.

    For a jet driven at this frequency it is the diameter over the wavelength.

    Parameters
    ----------
    velocity : float or array
        Speed [m/s].
    length : float or array
        Diameter of the jet, drop or obstacle [m].
    frequency : float or array
        Frequency in cycles per second [Hz].

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
    wavelength_ratio : For a driven jet, one over this.

    Notes
    -----
    ``St = f L / U``, with the frequency, not the angular frequency.

    Examples
    --------
    >>> from dropkit import numbers
    >>> numbers.strouhal(4.0, 2.0, 8.0)
    4.0
    """
    return frequency * length / velocity


@physical(returns="ratio", velocity="velocity > 0")
def cavitation_number(
    density: float, vapour_pressure: float, velocity: float, absolute_pressure: float
) -> float:
    """Cavitation number sigma_c: pressure above that of the vapour against dynamic pressure.

    The lower it is, the nearer the flow is to boiling where it is fastest.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    vapour_pressure : float or array
        Vapour pressure of the liquid, absolute [Pa].
    velocity : float or array
        Speed of the liquid [m/s].
    absolute_pressure : float or array
        Pressure of the liquid, absolute, not gauge [Pa].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments; negative below the vapour pressure.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``sigma_c = (p - p_v) / (rho U^2 / 2)``. Work on injector orifices often uses
    ``(p1 - p_v) / (p1 - p2)``, with the pressures before and behind the orifice, instead.

    Examples
    --------
    >>> from dropkit import numbers
    >>> numbers.cavitation_number(1000.0, 1e4, 10.0, 2e5)
    3.8
    """
    return (absolute_pressure - vapour_pressure) / (0.5 * density * velocity * velocity)


@physical(returns="ratio", flow="flow >= 0", pressure_drop="pressure > 0")
def discharge_coefficient(
    density: float, flow: float, length: float, pressure_drop: float
) -> float:
    """Discharge coefficient C_d: the flow of an orifice against that without losses.

    Contains friction as well as the contraction of the jet behind the orifice.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    flow : float or array
        Volume flow [m3/s].
    length : float or array
        Inner diameter of the orifice [m].
    pressure_drop : float or array
        Pressure difference across the orifice [Pa].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``C_d = Q / [(pi d^2 / 4) (2 dp / rho)^(1/2)]``. The contraction of a sharp-edged orifice
    is 0.61 to 0.64 in area, 0.78 to 0.80 in diameter; the free contraction of a laminar jet
    from a long pipe is 0.866 in diameter, 0.75 in area: two different things.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.discharge_coefficient(998.0, "1.2 L/min", "1.5 mm", "2 bar"), 4)
    0.5653
    """
    number: float = flow / (
        0.25 * math.pi * length * length * (2.0 * pressure_drop / density) ** 0.5
    )
    return number
