"""Start of growth on a jet of elastic liquid: long-wave Oldroyd-B, with what follows it."""

from __future__ import annotations

import math
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.boundary import physical
from dropkit.models.jet._viscous_relation import mapped
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = [
    "ElasticStart",
    "FastestElasticStart",
    "elastic_cautions",
    "growth_start_oldroyd_b",
    "most_unstable_start_oldroyd_b",
]

# Rounding in pi d / wavelength must not put the cut-off itself out of range.
_ROUNDING: Final = 1e-12
GROWING: Final = Range(0.0, 1.0 + _ROUNDING, "the reduced wavenumber pi d / wavelength", "")
SOLVENT: Final = Range(0.0, 1.0, "the viscosity of the solvent over that of the solution", "")
# Newton's steps fall from one side; so many only where the polymer slows growth a millionfold.
_STEPS: Final = 60

MODEL: Final = Published(
    gives="start of growth on an elastic jet, its Deborah number and the drain time of its threads",
    holds="the first, small waves on a dilute polymer solution that was not stretched before; long "
    "waves; says nothing of when the jet breaks",
    sources=("GoldinEtAl1969", "EntovHinch1997"),
    mark="C",
    place="Weber's equation with the viscosity mu_s + (mu - mu_s)/(1 + lambda w); thread radius "
    "as exp(-t/(3 lambda))",
    ranges=(GROWING, SOLVENT),
    agreement="faster growth at the start and later breakup are known of real polymer jets [M]; no "
    "points were seen",
)


class ElasticStart(NamedTuple):
    """How growth starts on an elastic jet, and what follows it.

    Parameters
    ----------
    growth_rate : float, array or Quantity
        Growth rate of the small wave at the start [1/s].
    drain_time : float, array or Quantity
        Time in which a thread between drops loses a factor e of its radius [s].
    deborah : float or array
        Deborah number on the radius of the jet [-]; above 1 beads on a string form.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> found = jet.growth_start_oldroyd_b(1000.0, 5e-3, 2e-3, 0.06, 1e-3, 1e-4, 5e-4)
    >>> f"{found.drain_time:.3f} s, {found.deborah:.0f}"
    '0.003 s, 22'
    """

    growth_rate: Any
    drain_time: Any
    deborah: Any


class FastestElasticStart(NamedTuple):
    """The fastest start of growth on an elastic jet, and what follows it.

    Parameters
    ----------
    growth_rate : float, array or Quantity
        Growth rate of the small wave at the start [1/s].
    drain_time : float, array or Quantity
        Time in which a thread between drops loses a factor e of its radius [s].
    deborah : float or array
        Deborah number on the radius of the jet [-]; above 1 beads on a string form.
    wavelength : float, array or Quantity
        Length of the wave that starts fastest [m].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> found = jet.most_unstable_start_oldroyd_b(1000.0, 5e-3, 2e-3, 0.06, 1e-3, 1e-4)
    >>> f"{1e6 * found.wavelength:.0f} um"
    '464 um'
    """

    growth_rate: Any
    drain_time: Any
    deborah: Any
    wavelength: Any


@physical(returns=("growth_rate", "duration", "ratio"), solvent_viscosity="viscosity >= 0")
def growth_start_oldroyd_b(
    density: float,
    viscosity: float,
    solvent_viscosity: float,
    surface_tension: float,
    relaxation_time: float,
    jet_diameter: float,
    wavelength: float,
    *,
    outside: Outside = "raise",
) -> ElasticStart:
    """Growth rate at which a small wave on an elastic jet starts, and the drain time that follows.

    Holds for small long waves on a dilute polymer solution that was not stretched before. At the
    start the polymer gives way and growth is FASTER than with the viscosity at rest; later its
    threads hold drops together and the jet breaks LATER, or not at all within reach. No breakup
    length follows from this growth rate.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the solution at rest [Pa*s].
    solvent_viscosity : float or array
        Dynamic viscosity of the solvent alone, the part without memory [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    relaxation_time : float or array
        Longest relaxation time of the liquid in extension [s].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    wavelength : float or array
        Length of the wave along the jet [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens below the cut-off at pi jet diameters, where "warn" and "allow" give a growth
        of 0, and for a solvent thicker than the solution.

    Returns
    -------
    ElasticStart
        ``growth_rate`` [1/s], ``drain_time`` [s] and ``deborah`` [-].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    See Also
    --------
    elastic_cautions : What must be said with the result.

    Notes
    -----
    The positive root of ``w^2 + 3 (m(w)/rho) k^2 w = gamma/(2 rho a^3) x^2 (1 - x^2)`` with
    ``m(w) = mu_s + (mu - mu_s)/(1 + lambda w)`` [C]: between Weber's growth with the viscosity at
    rest and that with the solvent's. A thread between drops thins as ``exp(-t/(3 lambda))``, so
    that its radius takes 3 relaxation times per factor e. ``De = lambda/sqrt(rho a^3/gamma)``.
    Stretch that the polymer brings along from the nozzle is not in the model: it slows the start.

    References
    ----------
    M. Goldin, J. Yerushalmi, R. Pfeffer, R. Shinnar, J. Fluid Mech. 38 (1969) 689-711.
    V. M. Entov, E. J. Hinch, J. Non-Newton. Fluid Mech. 72 (1997) 31-53,
    doi:10.1016/S0377-0257(97)00022-0.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> start = jet.growth_start_oldroyd_b
    >>> ink = ("1000 kg/m3", "5 mPa*s", "2 mPa*s", "60 mN/m", "1 ms")
    >>> found = start(*ink, "100 um", "500 um")
    >>> print(f"{found.growth_rate:.0f}, {found.drain_time:.3f}, De = {found.deborah:.1f}")
    7031 / second, 0.003 second, De = 21.9
    """
    x: Any = math.pi * jet_diameter / wavelength
    share: Any = solvent_viscosity / viscosity
    mask = outside_mask("growth_start_oldroyd_b", outside, (x, GROWING), (share, SOLVENT))
    ohnesorge, rate, deborah = _numbers(
        density, viscosity, surface_tension, relaxation_time, jet_diameter
    )
    reduced = mapped(_growth, x, ohnesorge, share, deborah)
    return _blanked(rate * reduced, relaxation_time, deborah, mask)


@physical(
    returns=("growth_rate", "duration", "ratio", "length"), solvent_viscosity="viscosity >= 0"
)
def most_unstable_start_oldroyd_b(
    density: float,
    viscosity: float,
    solvent_viscosity: float,
    surface_tension: float,
    relaxation_time: float,
    jet_diameter: float,
    *,
    outside: Outside = "raise",
) -> FastestElasticStart:
    """Fastest start of growth on an elastic jet, with its wavelength and the drain time after it.

    Holds as `growth_start_oldroyd_b` does. No breakup length follows from this growth rate.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity of the solution at rest [Pa*s].
    solvent_viscosity : float or array
        Dynamic viscosity of the solvent alone, the part without memory [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    relaxation_time : float or array
        Longest relaxation time of the liquid in extension [s].
    jet_diameter : float or array
        Diameter of the jet, not of the nozzle [m].
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens for a solvent thicker than the solution.

    Returns
    -------
    FastestElasticStart
        ``growth_rate`` [1/s], ``drain_time`` [s], ``deborah`` [-] and ``wavelength`` [m].

    Raises
    ------
    OutOfRange
        For a solvent thicker than the solution, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    At the maximum ``w = x^2/sqrt(2)`` in the units of `growth_start_oldroyd_b` and
    ``w = 1/(2 sqrt(2) + 6 Oh(w))``, a quadratic equation in w [C].

    References
    ----------
    M. Goldin, J. Yerushalmi, R. Pfeffer, R. Shinnar, J. Fluid Mech. 38 (1969) 689-711.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> ink = ("1000 kg/m3", "5 mPa*s", "2 mPa*s", "60 mN/m", "1 ms")
    >>> found = jet.most_unstable_start_oldroyd_b(*ink, "100 um")
    >>> print(f"{found.growth_rate:.0f} at {found.wavelength:.0f}")
    7095 / second at 464 micrometer
    """
    share: Any = solvent_viscosity / viscosity
    mask = outside_mask("most_unstable_start_oldroyd_b", outside, (share, SOLVENT))
    ohnesorge, rate, deborah = _numbers(
        density, viscosity, surface_tension, relaxation_time, jet_diameter
    )
    scale: Any = 8.0**0.5 + 6.0 * ohnesorge * share
    first: Any = scale + 6.0 * ohnesorge * (1.0 - share) - deborah
    # Without digits lost: the root of the sign that adds.
    root: Any = (first * first + 4.0 * deborah * scale) ** 0.5
    below = first >= 0.0
    w: Any = below * 2.0 / (first * below + root) + (1 - below) * (root - first) / (
        2.0 * deborah * scale
    )
    start = _blanked(rate * w, relaxation_time, deborah, mask)
    wavelength = math.pi * jet_diameter / (2.0**0.5 * w) ** 0.5
    return FastestElasticStart(*start, blank_outside(wavelength, mask))


def elastic_cautions(deborah: Any) -> tuple[str, ...]:
    """What must be said beside the start of growth on an elastic jet.

    Parameters
    ----------
    deborah : float or array
        Deborah number on the radius of the jet, from `growth_start_oldroyd_b` [-].

    Returns
    -------
    tuple of str
        One sentence each.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> print(jet.elastic_cautions(22.0)[-1])
    The Deborah number is 22, above 1: drops joined by threads (beads on a string) are expected.
    """
    said: tuple[str, ...] = (
        "The growth rate is that of the start only; real polymer jets break later than it says, "
        "so that no breakup length follows from it.",
        "A thread between drops loses a factor e of its radius in 3 relaxation times, until the "
        "polymer is fully stretched.",
        "Stretch that the liquid brings along from the nozzle is not modelled.",
    )
    most = float(np.max(deborah, initial=0.0, where=~np.isnan(deborah)))
    if most > 1.0:
        said += (
            f"The Deborah number is {most:.3g}, above 1: drops joined by threads (beads on a string) "
            "are expected.",
        )
    return said


def _numbers(
    density: Any, viscosity: Any, surface_tension: Any, relaxation_time: Any, jet_diameter: Any
) -> tuple[Any, Any, Any]:
    """Ohnesorge number on the radius, unit of growth rates, Deborah number."""
    radius = 0.5 * jet_diameter
    rate = (surface_tension / (density * radius**3)) ** 0.5
    return (
        viscosity / (density * surface_tension * radius) ** 0.5,
        rate,
        relaxation_time * rate,
    )


def _blanked(growth: Any, relaxation_time: Any, deborah: Any, mask: Any) -> ElasticStart:
    # All have one shape, and NaN where one input was NaN.
    none = 0.0 * growth
    return ElasticStart(
        blank_outside(growth, mask),
        blank_outside(3.0 * relaxation_time + none, mask),
        blank_outside(deborah + none, mask),
    )


def _growth(x: Any, h: Any, share: Any, deborah: Any) -> Any:
    t = x * x
    drive = 0.5 * np.maximum((1.0 - x) * (1.0 + x), 0.0) * t
    solvent, polymer = 3.0 * h * share * t, 3.0 * h * (1.0 - share) * t
    # The solvent alone bounds the root from above; the cubic is convex, so Newton's steps fall on it.
    w = 2.0 * drive / (solvent + (solvent * solvent + 4.0 * drive) ** 0.5)
    for _ in range(_STEPS):
        memory = 1.0 + deborah * w
        plain = w * w + solvent * w - drive
        value = plain * memory + polymer * w
        slope = (2.0 * w + solvent) * memory + deborah * plain + polymer
        step = value / slope
        w = w - step
        if not np.any(abs(step) > 1e-9 * abs(w)):
            break
    return w
