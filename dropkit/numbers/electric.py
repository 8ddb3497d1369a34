"""Numbers that compare electric forces with surface tension, for drops in a gas or a vacuum."""

from __future__ import annotations

import math
from typing import Final

from dropkit.boundary import physical

__all__ = [
    "electric_bond",
    "electric_bond_radius",
    "fissility",
    "rayleigh_charge_ratio",
    "taylor_field_ratio",
]

# Electric constant, F/m: CODATA 2018, as used for the check values in the tests.
_EPS0: Final = 8.8541878128e-12
# Taylor (1964) gives E (a / gamma)^(1/2) = 1.625 in Gaussian units, where E^2 is 4 pi eps0 E^2
# of SI. From memory, with a check: the balance of pressures at the pole and the equator of a
# spheroid, which is his method, gives 1.6254 (tests/numbers/test_electric.py).
_TAYLOR: Final = 1.625 / (4.0 * math.pi) ** 0.5


@physical(returns="ratio")
def electric_bond(surface_tension: float, length: float, electric_field: float) -> float:
    """Electric Bond number Bo_E: pressure of an electric field against surface tension.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the drop or jet [m].
    electric_field : float or array
        Electric field far from the drop [V/m].

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
    electric_bond_radius : Half of this, on the radius.
    taylor_field_ratio : The field over the one that an uncharged drop withstands.

    Notes
    -----
    ``Bo_E = eps0 E^2 d / gamma``. Some authors put the electric pressure ``eps0 E^2 / 2``
    instead.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.electric_bond("72.8 mN/m", "100 um", "1 MV/m"), 6)
    0.012162
    """
    return _EPS0 * electric_field * electric_field * length / surface_tension


@physical(returns="ratio")
def electric_bond_radius(surface_tension: float, radius: float, electric_field: float) -> float:
    """Electric Bond number Bo_Ea: pressure of an electric field against surface tension, on radius.

    Half of the number on the diameter; work on drops in fields mostly uses it.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    radius : float or array
        Radius of the drop or jet [m].
    electric_field : float or array
        Electric field far from the drop [V/m].

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
    electric_bond : The number on the diameter.

    Notes
    -----
    ``Bo_Ea = eps0 E^2 a / gamma = Bo_E / 2``. An uncharged conducting drop withstands 0.210.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.electric_bond_radius("72.8 mN/m", "50 um", "1 MV/m"), 6)
    0.006081
    """
    return _EPS0 * electric_field * electric_field * radius / surface_tension


@physical(returns="ratio")
def rayleigh_charge_ratio(surface_tension: float, length: float, charge: float) -> float:
    """Rayleigh charge ratio q/q_R: charge of a drop over the charge at which it bursts.

    Holds for one conducting drop without an outer field.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the drop [m].
    charge : float or array
        Charge of the drop [C].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments, with the sign of the charge.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    fissility : The square of this.

    Notes
    -----
    ``q_R = pi (8 eps0 gamma d^3)^(1/2)``, which is ``8 pi (eps0 gamma a^3)^(1/2)`` on the radius:
    mixing the two forms is wrong by a factor of 2.8.

    References
    ----------
    Rayleigh, Phil. Mag. 14 (1882) 184 (seen as quoted by others).

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.rayleigh_charge_ratio(0.0728, "100 um", "7.134029827 pC"), 9)
    1.0
    """
    number: float = charge / (
        math.pi * (8.0 * _EPS0 * surface_tension * length * length * length) ** 0.5
    )
    return number


@physical(returns="ratio")
def fissility(surface_tension: float, length: float, charge: float) -> float:
    """Fissility X: electric repulsion in a charged drop against surface tension.

    The square of the Rayleigh charge ratio.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the drop [m].
    charge : float or array
        Charge of the drop [C].

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
    rayleigh_charge_ratio : The square root of this.

    Notes
    -----
    ``X = q^2 / (8 pi^2 eps0 gamma d^3) = q^2 / (64 pi^2 eps0 gamma a^3)``.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.fissility(0.0728, "100 um", "3.567014914 pC"), 9)
    0.25
    """
    return (
        charge
        * charge
        / (8.0 * math.pi * math.pi * _EPS0 * surface_tension * length * length * length)
    )


@physical(returns="ratio")
def taylor_field_ratio(surface_tension: float, length: float, electric_field: float) -> float:
    """Taylor field ratio E/E_T: field over the one at which an uncharged drop bursts.

    Holds for one conducting, uncharged drop that is round without the field and has time to
    take its shape; charge, swaying and large size lower the limit.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension of the liquid [N/m].
    length : float or array
        Diameter of the drop before it is stretched [m].
    electric_field : float or array
        Electric field far from the drop [V/m].

    Returns
    -------
    float or array
        The number, in the broadcast shape of the arguments, with the sign of the field.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    electric_bond : The pressure of the field against surface tension.

    Notes
    -----
    ``E_T = 1.625 [gamma / (4 pi eps0 a)]^(1/2) = 0.458 [gamma / (eps0 a)]^(1/2)``, with the radius
    ``a``. Millimetre drops that sway in a wind tunnel with a horizontal field became unstable at
    0.98 +- 0.03 in place of 1.625 (abstract of a paper by R. Bhalwankar, seen without its title
    and year): 0.6 of this limit.

    References
    ----------
    Taylor G.I., Proc. R. Soc. A 280 (1964) 383-397 (abstract seen; the 1.625 from memory and
    recomputed).

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.taylor_field_ratio("72.8 mN/m", "2 mm", "1 MV/m"), 4)
    0.7608
    """
    number: float = electric_field * (_EPS0 * 0.5 * length / surface_tension) ** 0.5 / _TAYLOR
    return number
