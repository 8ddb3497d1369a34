"""Drops from the length of the wave that cuts them off."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["drop_diameter_from_wavelength", "wavelength_from_drop"]

MODEL: Final = Published(
    gives="diameter of the drop that one wavelength of jet makes",
    holds="one drop per wavelength, without satellites that stay apart; jet diameter, not nozzle",
    sources=("BerglundLiu1973",),
    mark="S2",
    place="D = (1.5 d^2 wavelength)^(1/3)",
    agreement="conservation of volume; Asset & Bales 1951, natural breakup, 4 jets: measured mean "
    "drops are 0.53 to 1.03 of the most unstable wave's (the small ones from large jets)",
)


@physical(returns="length")
def drop_diameter_from_wavelength(jet_diameter: float, wavelength: float) -> float:
    """Diameter of the drop that one wavelength of jet contracts into.

    Holds for one drop per wavelength. Waves below pi jet diameters do not grow, so no drop below
    1.68 jet diameters forms this way.

    Parameters
    ----------
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    wavelength : float or array
        Length of the wave along the jet [m].

    Returns
    -------
    float or array
        Drop diameter [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``D = (1.5 d^2 wavelength)^(1/3)`` [C, seen quoted from Berglund & Liu]: conservation of
    volume. At Rayleigh's optimum D/d = 1.8909.

    References
    ----------
    R. N. Berglund, B. Y. H. Liu, Environ. Sci. Technol. 7 (1973) 147,
    doi:10.1021/es60074a001.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.drop_diameter_from_wavelength('60 um', '270 um'):.1f}")
    113.4 micrometer
    """
    cube: Any = 1.5 * jet_diameter * jet_diameter * wavelength
    result: float = cube ** (1.0 / 3.0)
    return result


@physical(returns="length")
def wavelength_from_drop(jet_diameter: float, drop_diameter: float) -> float:
    """Wavelength on a given jet that makes drops of a given size.

    The inverse of `drop_diameter_from_wavelength`. Compare it with `cut_off_wavelength`: a
    shorter wave does not grow.

    Parameters
    ----------
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    drop_diameter : float or array
        Drop diameter [m].

    Returns
    -------
    float or array
        The wavelength [m].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``wavelength = D^3/(1.5 d^2)`` [C]: conservation of volume.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.wavelength_from_drop('60 um', '113.4 um'):.0f}")
    270 micrometer
    """
    return drop_diameter**3 / (1.5 * jet_diameter * jet_diameter)
