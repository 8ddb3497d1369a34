"""Where a jet takes over from dripping: the Weber number of the liquid is 8."""

from __future__ import annotations

from typing import Final

from dropkit.boundary import physical
from dropkit.models.published import Published

__all__ = ["JETTING_WEBER", "jetting_velocity_weber"]

JETTING_WEBER: Final = 8.0

MODEL: Final = Published(
    gives="speed above which a liquid jets rather than drips, as one Weber number",
    holds="round jets in gas; gravity and the wall of the tube are left out",
    sources=("LinReitz1998",),
    mark="S2",
    place="rho U^2 d/gamma = 8, as quoted from Reitz 1978 and Lin & Reitz 1998",
    agreement="six water jets of two studies were measured as jets at Weber numbers of 2.1 to 5.5. Others: 4 "
    "and less (Clanet & Lasheras, measured), 6.2 (absolute instability of an inviscid jet)",
)


@physical(returns="velocity")
def jetting_velocity_weber(density: float, surface_tension: float, jet_diameter: float) -> float:
    """Speed above which a liquid jets rather than drips, from a Weber number of 8.

    Holds as a rule for round jets in gas. It leaves out gravity and the tube's wall; for tubes that
    point down `jetting_velocity_gravity` has both, and asks for less speed.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet [m].

    Returns
    -------
    float or array
        The speed [m/s].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    jet_regimes : Every criterion side by side.

    Notes
    -----
    ``U = (8 gamma/(rho d))^(1/2)`` [S2]: Weber number on the diameter, of the LIQUID.

    References
    ----------
    S. P. Lin, R. D. Reitz, Annu. Rev. Fluid Mech. 30 (1998) 85.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.jetting_velocity_weber('998 kg/m3', '72.7 mN/m', '60 um'):.2f}")
    3.12 meter / second
    """
    found: float = (JETTING_WEBER * surface_tension / (density * jet_diameter)) ** 0.5
    return found
