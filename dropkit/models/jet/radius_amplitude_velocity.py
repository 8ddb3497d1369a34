"""What a modulated speed makes of a jet's radius: the long-wave initial-value solution."""

from __future__ import annotations

import math
from typing import Any, Final

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["radius_amplitude_from_velocity", "velocity_amplitude_from_radius"]

_ROUNDING: Final = 1e-12
GROWING: Final = Range(0.0, 1.0 + _ROUNDING, "the reduced wavenumber pi d / wavelength", "")

MODEL: Final = Published(
    gives="amplitude of the growing wave of the radius that a modulated speed starts",
    holds="long waves, small modulation, Newtonian liquid; jet Weber number far above 1, so that the "
    "modulation is carried along before it acts",
    sources=("Weber1931", "Denner2022"),
    mark="C",
    place="eps/a = k V/(2 (w+ - w-)), from the two roots of Weber's equation",
    ranges=(GROWING,),
    agreement="breakup lengths from it against direct simulations of Denner et al. 2022: see "
    "stimulated_breakup_length",
)


def damping_and_drive(
    density: Any, viscosity: Any, surface_tension: Any, jet_diameter: Any, wavelength: Any
) -> tuple[Any, Any]:
    """Half the sum of the two rates with its sign turned, and minus their product."""
    wavenumber = 2.0 * math.pi / wavelength
    x = math.pi * jet_diameter / wavelength
    radius = 0.5 * jet_diameter
    damping = 1.5 * (viscosity / density) * wavenumber * wavenumber
    drive = surface_tension / (2.0 * density * radius**3) * (x * x * (1.0 - x * x))
    return damping, drive * (drive > 0.0)


@physical(returns="length", velocity_amplitude="velocity > 0")
def radius_amplitude_from_velocity(
    density: float,
    viscosity: float,
    surface_tension: float,
    jet_diameter: float,
    wavelength: float,
    velocity_amplitude: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Amplitude of the growing wave of the radius that a modulated jet speed starts.

    Holds for long waves and small modulation. A jet that leaves a round hole has the hole's
    radius at first, whatever its speed does: the wave of the radius begins at zero, as the
    difference of a growing and a decaying wave. This is the growing one, extrapolated to the
    nozzle; one per cent of the speed is not one per cent of the radius.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    wavelength : float or array
        Length of the wave along the jet, speed over drive frequency [m].
    velocity_amplitude : float or array
        Amplitude, middle to peak, of the jet's speed at the nozzle [m/s].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens below the cut-off at pi jet diameters, where no wave grows.

    Returns
    -------
    float or array
        Amplitude of the growing wave of the jet's radius at the nozzle [m].

    Raises
    ------
    OutOfRange
        For a wavelength below pi jet diameters, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    In the frame of the jet, with ``eta = A cos kz`` the wave of the radius over the radius and
    ``v = V sin kz`` that of the speed, the long-wave equations of volume and momentum are
    ``2 A' = -k V`` and ``V' = -(gamma k/(rho a))(1 - x^2) A - 3 nu k^2 V`` [C, derived here].
    Together they give Weber's ``A'' + 3 nu k^2 A' = gamma/(2 rho a^3) x^2 (1 - x^2) A`` with roots
    ``w+ > 0 > w-``. From ``A = 0`` and ``V = V0``: ``|A| = k V0/(2 (w+ - w-)) (exp(w+ t) -
    exp(w- t))``, of which the first term counts here. Without viscosity ``eps/a = k V0/(4 w+)``.
    Waves that run on the jet (finite Weber number) are left out: an error of the order of one
    over the root of the Weber number. No published formula was seen to compare with.

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    One per cent of 20 m/s on a 60 um jet does as much as 8 % of its radius:

    >>> from dropkit.models import jet
    >>> start = jet.radius_amplitude_from_velocity(1050.0, 4e-3, 0.042, 60e-6, 280e-6, 0.20)
    >>> print(f"{start / 30e-6:.3f}")
    0.081
    """
    x: Any = math.pi * jet_diameter / wavelength
    mask = outside_mask("radius_amplitude_from_velocity", outside, (x, GROWING))
    damping, drive = damping_and_drive(
        density, viscosity, surface_tension, jet_diameter, wavelength
    )
    split = 2.0 * (damping * damping + drive) ** 0.5  # w+ - w-
    result: float = blank_outside(0.5 * x * velocity_amplitude / split, mask)
    return result


@physical(returns="velocity", radius_amplitude="length > 0")
def velocity_amplitude_from_radius(
    density: float,
    viscosity: float,
    surface_tension: float,
    jet_diameter: float,
    wavelength: float,
    radius_amplitude: float,
    *,
    outside: Outside = "raise",
) -> float:
    """Amplitude of the jet's speed that starts a growing wave of a given radius amplitude.

    The inverse of `radius_amplitude_from_velocity`: how hard a nozzle must be driven.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    wavelength : float or array
        Length of the wave along the jet, speed over drive frequency [m].
    radius_amplitude : float or array
        Amplitude of the growing wave of the jet's radius at the nozzle [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens below the cut-off at pi jet diameters, where no wave grows.

    Returns
    -------
    float or array
        Amplitude of the jet's speed at the nozzle [m/s].

    Raises
    ------
    OutOfRange
        For a wavelength below pi jet diameters, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``V0 = 2 (w+ - w-) eps/(k a)`` [C], see `radius_amplitude_from_velocity`.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> drive = jet.velocity_amplitude_from_radius(1050.0, 4e-3, 0.042, 60e-6, 280e-6, 0.3e-6)
    >>> print(f"{drive:.4f}")
    0.0247
    """
    x: Any = math.pi * jet_diameter / wavelength
    mask = outside_mask("velocity_amplitude_from_radius", outside, (x, GROWING))
    damping, drive = damping_and_drive(
        density, viscosity, surface_tension, jet_diameter, wavelength
    )
    split = 2.0 * (damping * damping + drive) ** 0.5
    result: float = blank_outside(2.0 * radius_amplitude * split / x, mask)
    return result
