"""Breakup length of a laminar jet from a long tube without drive: Grant & Middleman 1966."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["laminar_pipe_breakup_length"]

WEBER: Final = Range(7.0, 5060.0, "the Weber number of the liquid on the diameter", "")
OHNESORGE: Final = Range(0.004, 0.64, "the Ohnesorge number on the diameter", "")

MODEL: Final = Published(
    gives="breakup length of a laminar jet from a long tube, without drive",
    holds="long tube (about 100 diameters), laminar, Rayleigh regime, still air; the disturbances "
    "are those of Grant's apparatus",
    sources=("GrantMiddleman1966", "Grant1965", "TrettelCompilation"),
    mark="S2",
    place="L/d = 19.5 [We^0.5 (1 + 3 Oh)]^0.85",
    ranges=(WEBER, OHNESORGE),
    agreement="measured over formula, mean ratio and rms of ln: Grant 1965, 36 rows, 1.00, 0.103 "
    "(his single tables 0.87 to 1.18); other laboratories: Arai 1.00, 0.10; Sterling 1.15, 0.23; "
    "Asset & Bales 0.68, 0.46; Phinney 0.67, 0.44; Mansour 0.61, 0.74",
)


@physical(returns="distance", velocity="velocity > 0")
def laminar_pipe_breakup_length(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Breakup length of a laminar jet from a long tube without drive, as one laboratory found.

    Holds for laminar jets from tubes of about 100 diameters in still air, in the Rayleigh regime.
    Another rig's disturbances differ: expect a factor 2 either way, and see
    `natural_breakup_length` for a band over six studies.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside Weber numbers of 7 to 5060 and Ohnesorge numbers of 0.004 to 0.64
        (of which 0.085 to 0.63 is a gap between the rows).

    Returns
    -------
    float or array
        The breakup length [m].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``L/d = 19.5 [We^0.5 (1 + 3 Oh)]^0.85`` [S2], both numbers on the diameter. The exponent acts
    on the whole bracket: with it on the viscous factor alone, a form that is also met, the formula
    is too long by half or more against Grant's own tables. Grant's tables, as they were
    transcribed, give one diameter and do not tell jet from tube.

    The turbulent line of the same paper belongs to another mechanism:
    `turbulent_pipe_breakup_length`.

    References
    ----------
    R. P. Grant, S. Middleman, AIChE J. 12 (1966) 669-678, doi:10.1002/aic.690120411.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> length = jet.laminar_pipe_breakup_length
    >>> print(f"{length('1116 kg/m3', '17.9 mPa*s', '48.2 mN/m', '3.9 m/s', '1.37 mm'):.0f}")
    430 millimeter
    """
    weber: Any = density * velocity * velocity * jet_diameter / surface_tension
    ohnesorge: Any = viscosity / (density * surface_tension * jet_diameter) ** 0.5
    mask = outside_mask(
        "laminar_pipe_breakup_length", outside, (weber, WEBER), (ohnesorge, OHNESORGE)
    )
    bracket: Any = weber**0.5 * (1.0 + 3.0 * ohnesorge)
    result: float = blank_outside(19.5 * jet_diameter * bracket**0.85, mask)
    return result
