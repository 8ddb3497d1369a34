"""Cavitation in the hole: Nurick's number, where it begins, what it does to the flow."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.unit_table import STANDARD_ATMOSPHERE
from dropkit.validity import Outside, Range

__all__ = [
    "cavitation_inception_parameter",
    "cavitation_parameter",
    "discharge_coefficient_cavitating",
    "hydraulic_flip_parameter",
]

CAVITATING: Final = Range(1.0, 1.9, "the cavitation parameter", "")
EDGE: Final = Range(0.0, 0.14, "the radius of the entry's edge over the diameter", "")
FREE_AREA: Final = 0.611

MODEL: Final = Published(
    gives="cavitation parameter, the value below which a hole cavitates, the flow when it does, "
    "and the value below which the jet parts from the wall",
    holds="sharp or slightly rounded entry, jet into gas; the state changes abruptly and with "
    "hysteresis",
    sources=("Nurick1976", "AnsysFluentTheory"),
    mark="S2",
    place="K = (p1 - pv)/(p1 - p2); onset 1.9 (1 - r/d)^2 - 1000/Re; Cd = Cc sqrt(K), "
    "Cc = (1/0.611^2 - 11.4 r/d)^(-1/2); flip 1 + 1/((1 + L/4d)(1 + 2000/Re) exp(70 r/d)), as a "
    "published code writes out a manual's model",
    ranges=(EDGE, CAVITATING),
    agreement="no measured points were seen; the manual itself says that no established theory "
    "exists",
)


@physical(
    returns="ratio",
    gauge_pressure="gauge_pressure > 0",
    ambient_pressure="absolute_pressure > 0",
)
def cavitation_parameter(
    vapour_pressure: float, gauge_pressure: float, *, ambient_pressure: float = STANDARD_ATMOSPHERE
) -> float:
    """Cavitation parameter of a nozzle: small where the liquid is near boiling in the hole.

    Holds for any hole. A sharp-edged one cavitates below `cavitation_inception_parameter`; at 1
    and below the liquid boils in the surroundings themselves.

    Parameters
    ----------
    vapour_pressure : float or array
        Saturation pressure of the liquid at its temperature [Pa].
    gauge_pressure : float or array
        Pressure ahead of the nozzle, above that of the surroundings [Pa].
    ambient_pressure : float or array, keyword-only
        Pressure of the surroundings above vacuum [Pa].

    Returns
    -------
    float or array
        The parameter K [-].

    Raises
    ------
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``K = (p1 - pv)/(p1 - p2)``, p1 ahead of and p2 behind the nozzle, both absolute [S2]. Some
    define a number with p2 - pv above: that one is K - 1.

    References
    ----------
    W. H. Nurick, J. Fluids Eng. 98 (1976) 681-687.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.cavitation_parameter('2.34 kPa', '3 barg'):.2f}")
    1.33
    """
    upstream: Any = ambient_pressure + gauge_pressure
    result: float = (upstream - vapour_pressure) / gauge_pressure
    return result


@physical(returns="ratio", gauge_pressure="gauge_pressure > 0", edge_radius="radius >= 0")
def cavitation_inception_parameter(
    density: float,
    viscosity: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    *,
    edge_radius: float = 0.0,
    outside: Outside = "raise",
) -> float:
    """Cavitation parameter below which a hole cavitates.

    Holds for sharp entries and edges rounded by up to 0.14 diameters. Cavitating holes throw rough
    jets; small ones (a Reynolds number below about 1000) hardly cavitate by this form.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    gauge_pressure : float or array
        Pressure ahead of the nozzle, above that of the surroundings [Pa].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    edge_radius : float or array, keyword-only
        Radius of the entry's edge; 0 for a sharp one [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens for a rounder edge.

    Returns
    -------
    float or array
        The limit of K [-]; below 1 it is never reached in a liquid that does not boil outside.

    Raises
    ------
    OutOfRange
        For a rounder edge, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``1.9 (1 - r/d)^2 - 1000/Re``, Re on the loss-free speed ``sqrt(2 p/rho)`` [S2].

    References
    ----------
    W. H. Nurick, J. Fluids Eng. 98 (1976) 681-687; form as a published code has it.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> limit = nozzle.cavitation_inception_parameter
    >>> print(f"{limit('998 kg/m3', '1 mPa*s', '3 barg', '0.3 mm'):.2f}")
    1.76
    """
    ratio: Any = edge_radius / nozzle_diameter
    mask = outside_mask("cavitation_inception_parameter", outside, (ratio, EDGE))
    head: Any = nozzle_diameter * (2.0 * density * gauge_pressure) ** 0.5 / viscosity
    result: float = blank_outside(1.9 * (1.0 - ratio) ** 2 - 1000.0 / head, mask)
    return result


@physical(
    returns="ratio",
    gauge_pressure="gauge_pressure > 0",
    edge_radius="radius >= 0",
    ambient_pressure="absolute_pressure > 0",
)
def discharge_coefficient_cavitating(
    vapour_pressure: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    *,
    edge_radius: float = 0.0,
    ambient_pressure: float = STANDARD_ATMOSPHERE,
    outside: Outside = "raise",
) -> float:
    """Discharge coefficient of a hole that cavitates: its flow no longer depends on the surroundings.

    Holds for a cavitation parameter of 1 to 1.9 and below `cavitation_inception_parameter`; where
    the hole does not cavitate, another model of this folder speaks.

    Parameters
    ----------
    vapour_pressure : float or array
        Saturation pressure of the liquid at its temperature [Pa].
    gauge_pressure : float or array
        Pressure ahead of the nozzle, above that of the surroundings [Pa].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    edge_radius : float or array, keyword-only
        Radius of the entry's edge; 0 for a sharp one [m].
    ambient_pressure : float or array, keyword-only
        Pressure of the surroundings above vacuum [Pa].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside those ranges.

    Returns
    -------
    float or array
        Flow over that of a loss-free jet as wide as the hole [-].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``Cd = Cc sqrt(K)`` [S2], ``Cc = (1/0.611^2 - 11.4 r/d)^(-1/2)`` and at most 1.

    References
    ----------
    W. H. Nurick, J. Fluids Eng. 98 (1976) 681-687.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> print(f"{nozzle.discharge_coefficient_cavitating('2.34 kPa', '3 barg', '0.3 mm'):.3f}")
    0.705
    """
    ratio: Any = edge_radius / nozzle_diameter
    upstream: Any = ambient_pressure + gauge_pressure
    parameter: Any = (upstream - vapour_pressure) / gauge_pressure
    mask = outside_mask(
        "discharge_coefficient_cavitating", outside, (ratio, EDGE), (parameter, CAVITATING)
    )
    # A jet is never wider than the hole: the loss is at least 1.
    loss: Any = 1.0 / FREE_AREA**2 - 11.4 * ratio
    loss = np.maximum(loss, 1.0) if isinstance(loss, np.ndarray) else max(loss, 1.0) + 0.0 * loss
    result: float = blank_outside((parameter / loss) ** 0.5, mask)
    return result


@physical(
    returns="ratio",
    gauge_pressure="gauge_pressure > 0",
    edge_radius="radius >= 0",
)
def hydraulic_flip_parameter(
    density: float,
    viscosity: float,
    gauge_pressure: float,
    nozzle_diameter: float,
    nozzle_length: float,
    *,
    edge_radius: float = 0.0,
    outside: Outside = "raise",
) -> float:
    """Cavitation parameter below which the jet parts from the wall and gas fills the hole.

    Holds for sharp entries and edges rounded by up to 0.14 diameters. The jet is then thin, smooth
    and 0.61 of the hole in area.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    gauge_pressure : float or array
        Pressure ahead of the nozzle, above that of the surroundings [Pa].
    nozzle_diameter : float or array
        Diameter of the hole [m].
    nozzle_length : float or array
        Length of the hole [m].
    edge_radius : float or array, keyword-only
        Radius of the entry's edge; 0 for a sharp one [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens for a rounder edge.

    Returns
    -------
    float or array
        The limit of K [-].

    Raises
    ------
    OutOfRange
        For a rounder edge, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``1 + 1/((1 + L/(4d)) (1 + 2000/Re) exp(70 r/d))``, Re on the loss-free speed [S2].

    References
    ----------
    W. H. Nurick, J. Fluids Eng. 98 (1976) 681-687; form as a published code has it.

    Examples
    --------
    >>> from dropkit.models import nozzle
    >>> limit = nozzle.hydraulic_flip_parameter
    >>> print(f"{limit('998 kg/m3', '1 mPa*s', '3 barg', '0.3 mm', '1.2 mm'):.2f}")
    1.39
    """
    ratio: Any = edge_radius / nozzle_diameter
    mask = outside_mask("hydraulic_flip_parameter", outside, (ratio, EDGE))
    head: Any = nozzle_diameter * (2.0 * density * gauge_pressure) ** 0.5 / viscosity
    slender = 1.0 + 0.25 * nozzle_length / nozzle_diameter
    result: float = blank_outside(
        1.0 + math.e ** (-70.0 * ratio) / (slender * (1.0 + 2000.0 / head)), mask
    )
    return result
