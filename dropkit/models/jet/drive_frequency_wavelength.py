"""Drive frequency and wavelength: the jet carries the wave along."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["drive_frequency", "drive_wavelength"]

MODEL: Final = Published(
    gives="drive frequency for a wavelength, and back",
    holds="a jet with one speed over its section, fast against its capillary waves",
    sources=("SchneiderHendricks1964", "KellerRubinowTu1973"),
    mark="C",
    place="wavelength = U/f",
    agreement="kinematics; the correction for slow jets is of the order of one over the Weber number",
)


@physical(returns="frequency", velocity="velocity > 0")
def drive_frequency(velocity: float, wavelength: float) -> float:
    """Drive frequency that puts waves of a given length on a jet.

    Holds for jets that are fast against their own capillary waves (Weber number well above the
    dripping limit) and have one speed over their section.

    Parameters
    ----------
    velocity : float or array
        Speed of the jet [m/s].
    wavelength : float or array
        Length of the wave along the jet [m].

    Returns
    -------
    float or array
        Drive frequency [Hz].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``f = U/wavelength`` [C]. Between 3.5 and 7 jet diameters is quoted as the usable band for
    thin liquids (Schneider & Hendricks 1964 [M]).

    References
    ----------
    J. M. Schneider, C. D. Hendricks, Rev. Sci. Instrum. 35 (1964) 1349.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.drive_frequency('10 m/s', '270 um'):.2f}")
    37.04 kilohertz
    """
    return velocity / wavelength


@physical(returns="length", velocity="velocity > 0")
def drive_wavelength(velocity: float, frequency: float) -> float:
    """Wavelength that a drive frequency puts on a jet.

    The inverse of `drive_frequency`, under the same conditions.

    Parameters
    ----------
    velocity : float or array
        Speed of the jet [m/s].
    frequency : float or array
        Drive frequency [Hz].

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
    ``wavelength = U/f`` [C].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.drive_wavelength('10 m/s', '37 kHz'):.1f}")
    270.3 micrometer
    """
    return velocity / frequency
