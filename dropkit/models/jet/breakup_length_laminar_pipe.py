"""Breakup length of a laminar jet from a long tube without drive: Grant & Middleman 1966."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["laminar_pipe_breakup_length"]

WEBER: Final = Range(8.0, 4500.0, "the Weber number of the liquid on the diameter", "")
OHNESORGE: Final = Range(0.004, 0.085, "the Ohnesorge number on the diameter", "")

MODEL: Final = Published(
    gives="breakup length of a laminar jet from a long tube, without drive",
    holds="long tube (about 100 diameters), laminar, Rayleigh regime, still air; the disturbances "
    "are those of Grant's apparatus",
    sources=("GrantMiddleman1966", "Grant1965", "TrettelCompilation"),
    mark="S2",
    place="L/d = 19.5 [We^0.5 (1 + 3 Oh)]^0.85",
    ranges=(WEBER, OHNESORGE),
    agreement="Grant 1965, 7 Rayleigh rows held here: bias -5 %, rms of ln(L) 0.094 (32 rows of his "
    "tables: +0.9 %, 0.108); other laboratories: Arai 0 %, Sterling +15 %, Phinney -33 %, "
    "Asset & Bales -32 %, Mansour -39 % of the formula",
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
        What happens outside Weber numbers of 8 to 4500 and Ohnesorge numbers of 0.004 to 0.085.

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

    The turbulent line of the same paper, ``8.51 We^0.32``, belongs to another mechanism and is
    not part of this model.

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
