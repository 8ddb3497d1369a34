"""Flow of many holes under one pressure, with the tolerance of their diameter."""

from __future__ import annotations

from typing import Any, Final, Literal, NamedTuple, TypeAlias

import numpy as np

from dropkit.boundary import Boundary, physical
from dropkit.errors import BadInput, nearest
from dropkit.models.nozzle import _losses as losses
from dropkit.models.nozzle.pressure_blasius import flow_turbulent_tube
from dropkit.models.nozzle.pressure_developing_entrance import flow_developing_tube
from dropkit.models.nozzle.pressure_lichtarowicz import flow_long_orifice
from dropkit.models.nozzle.pressure_poiseuille_hagenbach import flow_laminar_tube
from dropkit.models.nozzle.pressure_thin_edge import flow_thin_plate
from dropkit.models.published import Published
from dropkit.validity import Outside

__all__ = ["ParallelFlow", "parallel_flow"]

HoleKind: TypeAlias = Literal[
    "laminar tube", "developing tube", "turbulent tube", "long orifice", "thin plate"
]

_FLOWS: Final[dict[str, Boundary[..., Any]]] = {
    "laminar tube": flow_laminar_tube,
    "developing tube": flow_developing_tube,
    "turbulent tube": flow_turbulent_tube,
    "long orifice": flow_long_orifice,
    "thin plate": flow_thin_plate,
}

MODEL: Final = Published(
    gives="flow per hole and in all of many holes under one pressure, and how far single holes lie "
    "apart",
    holds="the pressure ahead of all holes is the same: the pressure lost in the supply is small",
    sources=(),
    mark="C",
    place="the flow of one hole at its smallest, nominal and largest diameter",
    ranges=(losses.DRIVING,),
    agreement="as good as the model of the single hole",
)


class ParallelFlow(NamedTuple):
    """The flow of many holes under one pressure.

    Parameters
    ----------
    each : float, array or Quantity
        Flow of one hole of nominal diameter [m3/s].
    narrow, wide : float, array or Quantity
        Flow of one hole at the lower and at the upper end of the tolerance [m3/s].
    total : float, array or Quantity
        Flow of all holes, each taken as nominal [m3/s].

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> found = nozzle.parallel_flow(
    ...     998.2, 1e-3, 0.0727, 2e5, 60e-6, 2e-3, holes=100, diameter_tolerance=1e-6
    ... )
    >>> found.narrow < found.each < found.wide < found.total
    True
    """

    each: Any
    narrow: Any
    wide: Any
    total: Any


@physical(
    returns=("flow", "flow", "flow", "flow"),
    gauge_pressure="gauge_pressure > 0",
    holes="ratio > 0",
    diameter_tolerance="length >= 0",
)
def parallel_flow(
    density: float,
    viscosity: float,
    surface_tension: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    holes: float = 1.0,
    diameter_tolerance: float = 0.0,
    kind: HoleKind = "laminar tube",
    outside: Outside = "raise",
) -> ParallelFlow:
    """Flow per hole and in all of many holes under one pressure.

    Holds where the pressure ahead of all holes is the same. Holes whose diameters were measured one
    by one go into the flow function of their kind as an array; its sum is the flow in all.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    gauge_pressure : float or array
        Pressure ahead of the holes, above that of the surroundings [Pa].
    nozzle_diameter : float or array
        Nominal diameter of a hole [m].
    nozzle_length : float or array
        Length of a hole [m].
    holes : float or array, keyword-only
        Number of holes [-].
    diameter_tolerance : float or array, keyword-only
        How far a hole may be narrower or wider than nominal [m].
    kind : {"laminar tube", "developing tube", "turbulent tube", "long orifice", "thin plate"}
        Which model gives the flow of one hole.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside the range of that model, at any of the three diameters.

    Returns
    -------
    ParallelFlow
        ``each``, ``narrow``, ``wide`` and ``total`` [m3/s].

    Raises
    ------
    BadInput
        For another `kind`, or a tolerance not below the diameter.
    OutOfRange
        Outside the range of the model, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    Viscosity rules: flow goes as the fourth power of the diameter; inertia rules: as the square.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> found = nozzle.parallel_flow(
    ...     *("998.2 kg/m3", "1 mPa*s", "72.7 mN/m", "2 barg", "60 um", "2 mm"),
    ...     holes=100,
    ...     diameter_tolerance="1 um",
    ... )
    >>> print(f"{found.total:.0f}; {found.narrow:.3f} to {found.wide:.3f}")
    127 milliliter / minute; 1.205 milliliter / minute to 1.333 milliliter / minute
    """
    if not isinstance(kind, str) or kind not in _FLOWS:
        raise BadInput(
            f"kind={kind!r} is not known",
            allowed=", ".join(map(repr, _FLOWS)),
            choices=nearest(kind, list(_FLOWS)) if isinstance(kind, str) else (),
        )
    narrowed: Any = nozzle_diameter - diameter_tolerance
    if np.any(narrowed <= 0.0):
        raise BadInput(
            "diameter_tolerance leaves no hole", allowed="less than nozzle_diameter everywhere"
        )
    # Nothing of the others, so that all four results have the same shape and NaN.
    nothing = 0.0 * holes + 0.0 * diameter_tolerance

    def one(diameter: Any) -> Any:
        core: Any = _FLOWS[kind].si
        return core(
            density,
            viscosity,
            surface_tension,
            gauge_pressure,
            diameter,
            nozzle_length,
            outside=outside,
        )

    each = one(nozzle_diameter) + nothing
    return ParallelFlow(
        each,
        one(narrowed) + nothing,
        one(nozzle_diameter + diameter_tolerance) + nothing,
        each * holes,
    )
