"""Breakup length of a jet left to itself, with the band that the disturbance level leaves open."""

from __future__ import annotations

from typing import Any, Final, NamedTuple

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["BreakupLength", "natural_breakup_length"]

WEBER: Final = Range(2.0, 4500.0, "the Weber number of the liquid on the jet diameter", "")
OHNESORGE: Final = Range(0.0, 0.36, "the Ohnesorge number on the jet diameter", "")
BAND: Final = 2.4

MODEL: Final = Published(
    gives="breakup length of a jet without drive, with a 95 % band",
    holds="Rayleigh breakup in gas: laminar, gas Weber number below about 0.4 to 1.2, no drive",
    sources=(
        "Weber1931",
        "TrettelCompilation",
        "AssetBales1951",
        "Sterling1969",
        "Phinney1970",
        "Arai1985",
        "Mansour1994",
        "Grant1965",
    ),
    mark="C",
    place="L/d = C sqrt(We) (1 + 3 Oh), C = ln(a/eps0)",
    ranges=(WEBER, OHNESORGE),
    agreement="153 measured lengths of six studies (Rayleigh rows): bias of C = 10 is -3 %, rms of "
    "ln(L) 0.44, 152 of 153 inside the band of a factor 2.4; with C from five studies the band "
    "holds 92 to 100 % of the sixth, 98 % on average; 23 later rows of Grant 1965 within the "
    "range: all inside; a rig unlike those six may lie further off (a factor 3.2 by the spread "
    "between twelve tubes)",
)


class BreakupLength(NamedTuple):
    """A breakup length with its band.

    Parameters
    ----------
    length : float, array or Quantity
        The estimate [m].
    low, high : float, array or Quantity
        Ends of the 95 % band [m].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> found = jet.natural_breakup_length(998.2, 1.0e-3, 0.0727, 10.0, 60e-6)
    >>> found.low < found.length < found.high
    True
    """

    length: Any
    low: Any
    high: Any


@physical(
    returns=("distance", "distance", "distance"),
    velocity="velocity > 0",
    constant="ratio > 0",
)
def natural_breakup_length(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    *,
    constant: float = 10.0,
    outside: Outside = "raise",
) -> BreakupLength:
    """Breakup length of a jet without drive, with a 95 % band.

    Holds for laminar jets in gas that break up by surface tension (Rayleigh regime: gas Weber
    number below about 0.4 to 1.2). What disturbs a jet differs from rig to rig and cannot be
    known beforehand, hence the band: a factor 2.4 either way. Measure it where it matters.

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
    constant : float or array, keyword-only
        C, the logarithm of jet radius over initial disturbance [-]; 10 by default. From measured
        lengths on one rig it comes out between 5 and 25.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside Weber numbers of 2 to 4500 and Ohnesorge numbers up to 0.36.

    Returns
    -------
    BreakupLength
        ``length``, ``low`` and ``high`` [m].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``L/d = C sqrt(We) (1 + 3 Oh)`` [C], both numbers on the jet diameter: Weber's growth rate
    with an initial disturbance ``eps0 = a exp(-C)``. C = 10 and the factor 2.4 rest on
    153 measured lengths of six studies (jets of 0.3 to 9.8 mm, Weber number 2 to 4480,
    Ohnesorge number 0.001 to 0.36) in a compilation [S2]: bias -3 %, rms of ln(L) 0.44,
    152 inside the band. With C from five studies, each counted the same, the band of 2.4 holds
    92 to 100 % of the sixth. Its width was chosen with all six in sight: one made from five
    studies' rows alone would have held 22 % of Mansour's water jets, and by the spread between
    twelve tubes a new rig would need a factor 3.2. 23 rows of Grant 1965 within the range that
    had no part in the choice all lie inside. In the first wind-induced regime the formula is far
    too long (a factor 3 on average).

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> found = jet.natural_breakup_length("998 kg/m3", "1 mPa*s", "72.7 mN/m", "10 m/s", "60 um")
    >>> print(f"{found.length:.2f}, {found.low:.2f} to {found.high:.2f}")
    5.69 millimeter, 2.37 millimeter to 13.66 millimeter
    """
    weber: Any = density * velocity * velocity * jet_diameter / surface_tension
    ohnesorge: Any = viscosity / (density * surface_tension * jet_diameter) ** 0.5
    mask = outside_mask("natural_breakup_length", outside, (weber, WEBER), (ohnesorge, OHNESORGE))
    length = constant * jet_diameter * weber**0.5 * (1.0 + 3.0 * ohnesorge)
    length = blank_outside(length, mask)
    return BreakupLength(length, length / BAND, length * BAND)
