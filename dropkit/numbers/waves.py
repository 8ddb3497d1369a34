"""Numbers of waves on a jet."""

from __future__ import annotations

import math

from dropkit.boundary import physical

__all__ = ["reduced_wavenumber", "wavelength_ratio"]


@physical(returns="ratio")
def reduced_wavenumber(radius: float, wavelength: float) -> float:
    """Reduced wavenumber x: circumference of the jet against the wavelength.

    Parameters
    ----------
    radius : float or array
        Radius of the undisturbed jet [m].
    wavelength : float or array
        Wavelength on the jet [m].

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
    wavelength_ratio : ``pi`` over this.

    Notes
    -----
    ``x = k a = 2 pi a / lambda``. Waves grow below 1. The fastest one stands at 0.697 on an
    inviscid jet; the long-wave equation puts it at 0.707.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.reduced_wavenumber("25 um", "225.36 um"), 4)
    0.697
    """
    return 2.0 * math.pi * radius / wavelength


@physical(returns="ratio")
def wavelength_ratio(length: float, wavelength: float) -> float:
    """Wavelength ratio lambda/d: wavelength against the diameter of the jet.

    Parameters
    ----------
    length : float or array
        Diameter of the undisturbed jet [m].
    wavelength : float or array
        Wavelength on the jet; on a driven one, speed over frequency [m].

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
    reduced_wavenumber : ``pi`` over this.

    Notes
    -----
    ``lambda / d = pi / x``. Three values get mixed up: pi, below which nothing grows; 4.507, the
    fastest wave of an inviscid jet; 4.443, the same from the long-wave equation.

    Examples
    --------
    >>> from dropkit import numbers
    >>> round(numbers.wavelength_ratio("50 um", "225 um"), 9)
    4.5
    """
    return wavelength / length
