"""What is published on satellites, sentence by sentence, and whether it speaks of a given jet."""

from __future__ import annotations

import math
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.boundary import physical
from dropkit.models.published import Published
from dropkit.validity import Range

__all__ = ["SatelliteStatement", "drop_spacing", "satellite_statements"]

FEWEST: Final = Range(5.0, 7.0, "the drop spacing over the jet diameter", "")
GROWING: Final = Range(math.pi, math.inf, "the drop spacing over the jet diameter", "")

MODEL: Final = Published(
    gives="statements on satellites with their ranges; the spacing of drops in jet diameters",
    holds="a jet driven at one frequency, one main drop per wave",
    sources=("PimbleyLee1977", "GoeddeYuen1970", "Denner2022"),
    mark="S",
    place="abstracts",
    ranges=(FEWEST,),
    agreement="statements, not a formula; they don't give size, number or place of merging",
)


class SatelliteStatement(NamedTuple):
    """One statement on satellites.

    Parameters
    ----------
    about : str
        ``"when"``, ``"size"``, ``"merging"`` or ``"drive"``.
    says : str
        The statement.
    holds : str
        What it was found on, as far as that was seen.
    source : str
        Source key; empty for what is remembered only.
    mark : str
        How it was seen: S, S2, C or M.
    applies : bool or array of bool
        Whether the jet asked about lies where the statement was made.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> jet.satellite_statements(60e-6, 360e-6)[0].applies
    True
    """

    about: str
    says: str
    holds: str
    source: str
    mark: str
    applies: Any


@physical(returns="ratio")
def drop_spacing(jet_diameter: float, wavelength: float) -> float:
    """Spacing of the main drops in jet diameters, right after breakup.

    Holds for one drop per wave. Pimbley & Lee found satellites least likely from 5 to 7.

    Parameters
    ----------
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    wavelength : float or array
        Length of the wave along the jet [m].

    Returns
    -------
    float or array
        The wavelength over the diameter [-].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``wavelength/d`` [C].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.drop_spacing('60 um', '280 um'):.2f}")
    4.67
    """
    return wavelength / jet_diameter


def satellite_statements(jet_diameter: Any, wavelength: Any) -> tuple[SatelliteStatement, ...]:
    """What is published on satellites, and which of it speaks of a given jet.

    Gives sentences with their sources and ranges instead of a number, because no formula that
    holds for jets in general was seen.

    Parameters
    ----------
    jet_diameter : float, array, str or Quantity
        Diameter of the jet, not of the nozzle [m].
    wavelength : float, array, str or Quantity
        Length of the wave along the jet [m].

    Returns
    -------
    tuple of SatelliteStatement
        When satellites form, how large they are, how they merge, what a strong drive does.

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    Abstracts and points of figures were seen, no paper as a whole. Which of the two ends of the
    thread breaks first decides to which drop a satellite goes; what was seen gives no limits of
    spacing, amplitude or viscosity for it.

    References
    ----------
    W. T. Pimbley, H. C. Lee, IBM J. Res. Dev. 21 (1977) 21-30.
    E. F. Goedde, M. C. Yuen, J. Fluid Mech. 40 (1970) 495-511, doi:10.1017/S0022112070000289.
    F. Denner et al., Flow Turbul. Combust. 108 (2022) 843-863,
    doi:10.1007/s10494-021-00291-w.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> for statement in jet.satellite_statements("60 um", "280 um")[:2]:
    ...     print(statement.about, statement.applies, "-", statement.says)
    when False - satellites are least likely where main drops are 5 to 7 jet diameters apart
    size True - the ligaments between drops, which become satellites, shrink as the wave gets shorter
    """
    spacing = drop_spacing(jet_diameter, wavelength)
    values = np.asarray(getattr(spacing, "magnitude", spacing), dtype=float)
    growing = values >= GROWING.low
    near = (values > math.pi / 0.75) & (values < math.pi / 0.65)
    fewest = (values >= FEWEST.low) & (values <= FEWEST.high)

    def plain(where: Any) -> Any:
        return where if where.ndim else bool(where)

    return (
        SatelliteStatement(
            "when",
            "satellites are least likely where main drops are 5 to 7 jet diameters apart",
            "a vibrated nozzle; liquid, speed and amplitude were not seen",
            "PimbleyLee1977",
            "S",
            plain(fewest),
        ),
        SatelliteStatement(
            "size",
            "the ligaments between drops, which become satellites, shrink as the wave gets shorter",
            "vertical jets of several viscosities, driven at audio frequency; figures not seen",
            "GoeddeYuen1970",
            "S",
            plain(growing),
        ),
        SatelliteStatement(
            "merging",
            "a ligament rolls up into a drop, which in the end may merge with a main drop",
            "vertical jets of several viscosities, driven at audio frequency; figures not seen",
            "GoeddeYuen1970",
            "S",
            plain(growing),
        ),
        SatelliteStatement(
            "merging",
            "a thread that lets go of the drop ahead first is slowed and merges with the drop behind; "
            "one that breaks first at its rear end is pushed on and merges with the drop ahead; one "
            "that breaks at both ends at once stays between them; amplitude and harmonics of the "
            "drive decide which",
            "no limits were seen",
            "",
            "M",
            plain(growing),
        ),
        SatelliteStatement(
            "drive",
            "a stronger drive shortens the jet only up to a speed amplitude of about 0.3 of the speed "
            "(Weber number 20 on the radius) or 0.2 (50); beyond, the jet gets longer again",
            "simulations at reduced wavenumber 0.7, Ohnesorge number 0.1 on the radius, no gravity",
            "Denner2022",
            "S2",
            plain(near),
        ),
    )
