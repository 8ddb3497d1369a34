"""Numbers of drops as particles in a gas: inertia and the graininess of the gas."""

from __future__ import annotations

from dropkit.boundary import physical

__all__ = ["knudsen", "stokes"]


@physical(returns="ratio", velocity="velocity >= 0", obstacle="length")
def stokes(
    density: float, velocity: float, length: float, obstacle: float, gas_viscosity: float
) -> float:
    """Stokes number Stk: stopping distance of a drop against the size of an obstacle.

    A drop far below 1 follows the gas round the obstacle, far above 1 it flies into it. Holds
    while the drag on the drop is Stokes', its own Reynolds number below about 1.

    Parameters
    ----------
    density : float or array
        Density of the drop [kg/m3].
    velocity : float or array
        Speed of the gas that carries the drop [m/s].
    length : float or array
        Diameter of the drop [m].
    obstacle : float or array
        Size of the obstacle or of the jet of gas, its diameter or width [m].
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
    knudsen : Below a few micrometres the number grows by the slip correction.

    Notes
    -----
    ``Stk = rho d^2 U / (18 mu_g L)``, the inertial number. Work on impactors often takes half the
    width of the jet for ``L``: its numbers are twice as large.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.stokes(1000.0, 0.9, "10 um", "1 mm", 1e-5), 9)
    0.5
    """
    return density * length * length * velocity / (18.0 * gas_viscosity * obstacle)


@physical(returns="ratio")
def knudsen(radius: float, mean_free_path: float) -> float:
    """Knudsen number Kn: mean free path of the gas against the radius of a drop.

    On the RADIUS, as aerosol work has it: ``2 lambda / d``.

    Parameters
    ----------
    radius : float or array
        Radius of the drop [m].
    mean_free_path : float or array
        Mean free path of the gas [m].

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
    ``Kn = lambda / a``. Slip coefficients fitted for a number on the diameter are half or double
    those for this one.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.knudsen("0.5 um", "66 nm"), 9)
    0.132
    """
    return mean_free_path / radius
