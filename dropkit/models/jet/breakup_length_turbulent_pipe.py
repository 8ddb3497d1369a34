"""Breakup length of a turbulent jet from a long tube without drive: Grant & Middleman 1966."""

from __future__ import annotations

from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["turbulent_pipe_breakup_length"]

WEBER: Final = Range(300.0, 1.25e5, "the Weber number of the liquid on the diameter", "")
REYNOLDS: Final = Range(3700.0, 3.0e5, "the Reynolds number on the diameter", "")

MODEL: Final = Published(
    gives="breakup length of a turbulent jet from a long tube, without drive",
    holds="long tube, turbulent when it leaves, breakup by its own turbulence (second wind-induced "
    "regime), thin liquids, still air up to 1 atm",
    sources=(
        "GrantMiddleman1966",
        "Grant1965",
        "Chen1962",
        "Phinney1975",
        "Sallam2002",
        "TrettelCompilation",
    ),
    mark="S2",
    place="L/d = 8.51 We^0.32",
    ranges=(WEBER, REYNOLDS),
    agreement="measured over formula, mean ratio and rms of ln: Grant 1965, 17 rows, 0.98, 0.088; "
    "Chen 1962, 15 rows, 1.00, 0.059; Phinney 1975, 25 rows, 1.04, 0.072; Sallam 2002, 4 rows "
    "of the second wind-induced regime, 0.98, 0.090, but 0.71 for 2 rows in transition to it "
    "and 0.79 for 4 atomising rows",
)


@physical(returns="distance", velocity="velocity > 0")
def turbulent_pipe_breakup_length(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Breakup length of a jet that leaves a long tube turbulent, without drive.

    Holds for turbulent flow from a long tube in still air, where the jet's own turbulence
    breaks it. A laminar jet, also a fast one from a short smooth hole, is another thing
    (`laminar_pipe_breakup_length`).

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s]; for the Reynolds number only.
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet [m/s].
    jet_diameter : float or array
        Diameter of the jet [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside Weber numbers of 300 to 125 000 and Reynolds numbers of 3700 to
        300 000.

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
    ``L/d = 8.51 We^0.32`` [S2], the Weber number on the diameter. The range is that of 61 measured
    rows of four studies (jets of 0.31 to 18 mm), of which three are other laboratories than the
    formula's: they agree within 4 % on average and 9 % in rms. In the transition to this regime
    jets are shorter by a third, and atomising ones by a fifth.

    References
    ----------
    R. P. Grant, S. Middleman, AIChE J. 12 (1966) 669-678, doi:10.1002/aic.690120411.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> length = jet.turbulent_pipe_breakup_length
    >>> print(f"{length('802 kg/m3', '1.32 mPa*s', '23.3 mN/m', '30 m/s', '0.62 mm'):.0f}")
    124 millimeter
    """
    weber: Any = density * velocity * velocity * jet_diameter / surface_tension
    reynolds: Any = density * velocity * jet_diameter / viscosity
    mask = outside_mask(
        "turbulent_pipe_breakup_length", outside, (weber, WEBER), (reynolds, REYNOLDS)
    )
    # With an unknown Reynolds number it is unknown whether the jet is turbulent: NaN.
    length = 8.51 * jet_diameter * weber**0.32 + 0.0 * reynolds
    result: float = blank_outside(length, mask)
    return result
