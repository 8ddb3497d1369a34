"""Growth of waves on a viscous jet that moves through gas: Weber 1931, Sterling & Sleicher 1975."""

from __future__ import annotations

import math
from typing import Any, Final, Literal, TypeAlias

from dropkit.boundary import physical
from dropkit.errors import UnknownName, nearest
from dropkit.models.jet._gas_waves import band, cut_off, fastest, growth
from dropkit.models.jet.growth_inviscid import GrowthBand
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = [
    "cut_off_wavelength_aerodynamic",
    "growth_band_aerodynamic",
    "growth_rate_aerodynamic",
    "maximum_growth_aerodynamic",
    "most_unstable_wavelength_aerodynamic",
]

Form: TypeAlias = Literal["sterling", "weber"]
# The share of the inviscid gas pressure that acts.
SHARES: Final = {"sterling": 0.175, "weber": 1.0}

_ROUNDING: Final = 1e-12
GROWING: Final = Range(0.0, 1.0 + _ROUNDING, "the wavenumber over that of the cut-off", "")
GAS: Final = {
    "sterling": Range(0.0, 10.0, "the Weber number of the gas on the jet diameter", ""),
    "weber": Range(0.0, 0.4, "the Weber number of the gas on the jet diameter", ""),
}

MODEL: Final = Published(
    gives="growth rate of a wave, the most unstable wave, its band and the cut-off, with the pull of "
    "the gas",
    holds="Newtonian liquid, long waves, laminar jet without relaxation of its velocity profile, up "
    "to the speed of the longest jet; Ohnesorge number on the diameter below about 0.02",
    sources=("SterlingSleicher1975", "Weber1931", "Sterling1969", "TrettelCompilation"),
    mark="S2",
    place="w^2 + 3 nu k^2 w = gamma/(2 rho a^3) x^2 (1 - x^2) + C rho_g U^2/(2 rho a^2) x^3 K0/K1",
    ranges=(GROWING, *GAS.values()),
    agreement="breakup lengths of Sterling 1969, sharp orifice, 21 rows, one disturbance level "
    "(ln(a/eps0) = 15.2), formula over measured: C = 0.175 bias -1 %, rms of ln 0.053, all within "
    "14 %; C = 1 within 8 % up to a gas Weber number of 0.47, 0.75 at 1, 0.14 at 9; no gas 1.7 at 9.5",
)


@physical(returns="growth_rate", velocity="velocity > 0")
def growth_rate_aerodynamic(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    wavelength: float,
    gas_density: float,
    *,
    form: Form = "sterling",
    outside: Outside = "raise",
) -> float:
    """Growth rate of a small wave on a viscous jet that moves through gas.

    Holds for laminar jets of thin Newtonian liquids (Ohnesorge number on the diameter below about
    0.02) whose speed is even over the section, for gas Weber numbers up to 10 in Sterling &
    Sleicher's form and up to 0.4 in Weber's, which makes too much of the gas.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet relative to the gas [m/s].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    wavelength : float or array
        Length of the wave along the jet [m].
    gas_density : float or array
        Density of the gas [kg/m3].
    form : {"sterling", "weber"}, keyword-only
        Which share of the inviscid gas pressure acts: C = 0.175 or 1.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens below the cut-off, where waves decay, and above the gas Weber number;
        "warn" and "allow" give the decay as a negative growth rate.

    Returns
    -------
    float or array
        Amplitudes grow as exp(growth rate x time) [1/s].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnknownName
        For another form.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The larger root of ``w^2 + 3 (mu/rho) k^2 w = gamma/(2 rho a^3) x^2 (1 - x^2)
    + C rho_g U^2/(2 rho a^2) x^3 K0(x)/K1(x)``, ``x = pi d/wavelength``, ``a`` the radius [S2]. That
    the older theory overestimates the gas is in the abstract of 1975 [S]; C = 0.175 was seen
    quoted [S2]. Where the profile of a long tube relaxes at the same time waves grow faster still.

    References
    ----------
    A. M. Sterling, C. A. Sleicher, J. Fluid Mech. 68 (1975) 477-495,
    doi:10.1017/S0022112075001772.
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> grow = jet.growth_rate_aerodynamic
    >>> print(f"{grow(998.2, 1.0e-3, 0.0727, '5 m/s', '2.4 mm', '10.6 mm', 1.2):.1f}")
    74.9 / second
    """
    gas, coupling = _gas(surface_tension, velocity, jet_diameter, gas_density, form)
    x: Any = math.pi * jet_diameter / wavelength
    mask = outside_mask(
        "growth_rate_aerodynamic", outside, (x / cut_off(coupling), GROWING), (gas, GAS[form])
    )
    ohnesorge, scale = _liquid(density, viscosity, surface_tension, jet_diameter)
    result: float = blank_outside(scale * growth(x, ohnesorge, coupling), mask)
    return result


@physical(returns="length", velocity="velocity > 0")
def most_unstable_wavelength_aerodynamic(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    gas_density: float,
    *,
    form: Form = "sterling",
    outside: Outside = "raise",
) -> float:
    """Wavelength that grows fastest on a viscous jet that moves through gas.

    Holds as `growth_rate_aerodynamic` does. The gas makes it shorter.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet relative to the gas [m/s].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    gas_density : float or array
        Density of the gas [kg/m3].
    form : {"sterling", "weber"}, keyword-only
        Which share of the inviscid gas pressure acts: C = 0.175 or 1.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above the gas Weber number of 10, or 0.4 in Weber's form.

    Returns
    -------
    float or array
        The wavelength [m].

    Raises
    ------
    OutOfRange
        For a higher gas Weber number, unless `outside` says otherwise.
    UnknownName
        For another form.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The maximum of `growth_rate_aerodynamic` over the wavelength.

    References
    ----------
    A. M. Sterling, C. A. Sleicher, J. Fluid Mech. 68 (1975) 477-495,
    doi:10.1017/S0022112075001772.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> wave = jet.most_unstable_wavelength_aerodynamic
    >>> print(f"{wave(998.2, 1.0e-3, 0.0727, '5 m/s', '2.4 mm', 1.2):.0f}")
    10360 micrometer
    """
    gas, coupling = _gas(surface_tension, velocity, jet_diameter, gas_density, form)
    mask = outside_mask("most_unstable_wavelength_aerodynamic", outside, (gas, GAS[form]))
    ohnesorge, _ = _liquid(density, viscosity, surface_tension, jet_diameter)
    t, _ = fastest(ohnesorge, coupling)
    result: float = blank_outside(math.pi * jet_diameter / t**0.5, mask)
    return result


@physical(returns="growth_rate", velocity="velocity > 0")
def maximum_growth_aerodynamic(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    gas_density: float,
    *,
    form: Form = "sterling",
    outside: Outside = "raise",
) -> float:
    """Growth rate of the fastest-growing wave on a viscous jet that moves through gas.

    Holds as `growth_rate_aerodynamic` does.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet relative to the gas [m/s].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    gas_density : float or array
        Density of the gas [kg/m3].
    form : {"sterling", "weber"}, keyword-only
        Which share of the inviscid gas pressure acts: C = 0.175 or 1.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above the gas Weber number of 10, or 0.4 in Weber's form.

    Returns
    -------
    float or array
        The growth rate [1/s].

    Raises
    ------
    OutOfRange
        For a higher gas Weber number, unless `outside` says otherwise.
    UnknownName
        For another form.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The maximum of `growth_rate_aerodynamic` over the wavelength.

    References
    ----------
    A. M. Sterling, C. A. Sleicher, J. Fluid Mech. 68 (1975) 477-495,
    doi:10.1017/S0022112075001772.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> fast = jet.maximum_growth_aerodynamic
    >>> print(f"{fast(998.2, 1.0e-3, 0.0727, '5 m/s', '2.4 mm', 1.2):.1f}")
    74.9 / second
    """
    gas, coupling = _gas(surface_tension, velocity, jet_diameter, gas_density, form)
    mask = outside_mask("maximum_growth_aerodynamic", outside, (gas, GAS[form]))
    ohnesorge, scale = _liquid(density, viscosity, surface_tension, jet_diameter)
    _, w = fastest(ohnesorge, coupling)
    result: float = blank_outside(scale * w, mask)
    return result


@physical(returns="length", velocity="velocity > 0")
def cut_off_wavelength_aerodynamic(
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    gas_density: float,
    *,
    form: Form = "sterling",
    outside: Outside = "raise",
) -> float:
    """Shortest wavelength that grows on a jet that moves through gas, at any viscosity.

    Holds as `growth_rate_aerodynamic` does. Without gas it is pi jet diameters, with it less.

    Parameters
    ----------
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet relative to the gas [m/s].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    gas_density : float or array
        Density of the gas [kg/m3].
    form : {"sterling", "weber"}, keyword-only
        Which share of the inviscid gas pressure acts: C = 0.175 or 1.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above the gas Weber number of 10, or 0.4 in Weber's form.

    Returns
    -------
    float or array
        The wavelength [m].

    Raises
    ------
    OutOfRange
        For a higher gas Weber number, unless `outside` says otherwise.
    UnknownName
        For another form.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The root of ``1 - x^2 + C We_g x K0(x)/K1(x) = 0``, We_g on the radius [C].

    References
    ----------
    A. M. Sterling, C. A. Sleicher, J. Fluid Mech. 68 (1975) 477-495,
    doi:10.1017/S0022112075001772.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(f"{jet.cut_off_wavelength_aerodynamic(0.0727, '5 m/s', '2.4 mm', 1.2):.0f}")
    7313 micrometer
    """
    gas, coupling = _gas(surface_tension, velocity, jet_diameter, gas_density, form)
    mask = outside_mask("cut_off_wavelength_aerodynamic", outside, (gas, GAS[form]))
    result: float = blank_outside(math.pi * jet_diameter / cut_off(coupling), mask)
    return result


@physical(returns=("length", "length"), velocity="velocity > 0", share="fraction")
def growth_band_aerodynamic(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    gas_density: float,
    *,
    share: float = 0.8,
    form: Form = "sterling",
    outside: Outside = "raise",
) -> GrowthBand:
    """Wavelengths that grow at a share of the fastest growth or more, jet in gas.

    Holds as `growth_rate_aerodynamic` does.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the liquid [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet relative to the gas [m/s].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    gas_density : float or array
        Density of the gas [kg/m3].
    share : float or array, keyword-only
        Growth rate at the ends over its maximum [-]; 0.8 by default.
    form : {"sterling", "weber"}, keyword-only
        Which share of the inviscid gas pressure acts: C = 0.175 or 1.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens above the gas Weber number of 10, or 0.4 in Weber's form.

    Returns
    -------
    GrowthBand
        ``shortest`` and ``longest`` wavelength [m].

    Raises
    ------
    OutOfRange
        For a higher gas Weber number, unless `outside` says otherwise.
    UnknownName
        For another form.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The two roots of the relation at ``share`` of its maximum.

    References
    ----------
    A. M. Sterling, C. A. Sleicher, J. Fluid Mech. 68 (1975) 477-495,
    doi:10.1017/S0022112075001772.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> ends = jet.growth_band_aerodynamic(998.2, 1.0e-3, 0.0727, "5 m/s", "2.4 mm", 1.2)
    >>> print(f"{ends.shortest:.0f} to {ends.longest:.0f}")
    8191 micrometer to 16365 micrometer
    """
    gas, coupling = _gas(surface_tension, velocity, jet_diameter, gas_density, form)
    mask = outside_mask("growth_band_aerodynamic", outside, (gas, GAS[form]))
    ohnesorge, _ = _liquid(density, viscosity, surface_tension, jet_diameter)
    low, high = band(ohnesorge, coupling, share)
    around: Any = math.pi * jet_diameter
    return GrowthBand(
        blank_outside(around / high**0.5, mask), blank_outside(around / low**0.5, mask)
    )


def _gas(
    surface_tension: Any, velocity: Any, jet_diameter: Any, gas_density: Any, form: Any
) -> tuple[Any, Any]:
    """Weber number of the gas on the diameter, and C times that on the radius."""
    if not isinstance(form, str) or form not in SHARES:
        raise UnknownName(
            f"there is no form {form!r} of the gas's pull",
            allowed=", ".join(SHARES),
            choices=nearest(str(form), tuple(SHARES)),
        )
    weber = gas_density * velocity * velocity * jet_diameter / surface_tension
    return weber, 0.5 * SHARES[form] * weber


def _liquid(
    density: Any, viscosity: Any, surface_tension: Any, jet_diameter: Any
) -> tuple[Any, Any]:
    """Ohnesorge number on the radius, and the unit of growth rates."""
    radius = 0.5 * jet_diameter
    ohnesorge = viscosity / (density * surface_tension * radius) ** 0.5
    return ohnesorge, (surface_tension / (density * radius**3)) ** 0.5
