"""Breakup length of a jet that gravity speeds up and thins: growth added up along the way."""

from __future__ import annotations

import math
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.boundary import physical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Outside, Range

__all__ = ["GravityBreakup", "gravity_thinned_breakup_length"]

WEBER: Final = Range(2.0, 4500.0, "the Weber number of the liquid at the nozzle, on diameter", "")
_ROUNDING: Final = 1e-12
GROWING: Final = Range(
    0.0, 1.0 + _ROUNDING, "the reduced wavenumber pi d / wavelength, of a given wave", ""
)

# Gauss-Legendre nodes v on 0..1 behind the cut-off, as v^2 and 2 v dv; axes: node, wave, element.
_NODES, _WEIGHTS = (part.reshape(-1, 1, 1) for part in np.polynomial.legendre.leggauss(24))
_SQUARES: Final = (0.5 * _NODES + 0.5) ** 2
_MASSES: Final = _WEIGHTS * (0.5 * _NODES + 0.5)
_STEPS: Final = 30  # Newton's steps; from the start below most cases need 6
_DAMPED: Final = 8  # from here on half steps, because the curvature jumps where wave and jet fit
_SHIFT: Final = 1e-3  # of ln(wavenumber), for the slope and curvature of the gain
_SHIFTS: Final = np.array([[-_SHIFT], [0.0], [_SHIFT]])
_CHUNK: Final = 256  # elements worked on at once, so that the nodes stay in the cache

MODEL: Final = Published(
    gives="breakup length of a falling jet, the wave that breaks it, and the jet's diameter there",
    holds="a jet straight downwards in free fall, small long waves, stretched with the "
    "liquid, gas Weber number far below 1",
    sources=("Weber1931", "Javadi2013", "ShuklaGallaire2019"),
    mark="C",
    place="ln(a/eps0) = integral of w dt, d = d0 (U0/U)^(1/2), wavelength = wavelength0 U/U0",
    ranges=(WEBER, GROWING),
    agreement="no measured lengths of jets known to fall freely were found as numbers; the limit of "
    "no gravity is natural_breakup_length, that of strong stretching the published scaling of "
    "Javadi et al. 2013",
)


class GravityBreakup(NamedTuple):
    """Where a falling jet breaks, and by which wave.

    Parameters
    ----------
    length : float, array or Quantity
        Breakup length [m].
    wavelength : float, array or Quantity
        Length of the breaking wave at the nozzle [m]; its drop has the volume of that much jet.
    jet_diameter : float, array or Quantity
        Diameter of the jet where it breaks [m].

    Examples
    --------
    >>> from dropkit.models import jet
    >>> found = jet.gravity_thinned_breakup_length(1250.0, 0.5, 0.063, 0.5, 1e-3)
    >>> found.jet_diameter < 1e-3
    True
    """

    length: Any
    wavelength: Any
    jet_diameter: Any


@physical(
    returns=("distance", "length", "length"),
    velocity="velocity > 0",
    constant="ratio > 0",
    gravity="acceleration >= 0",
)
def gravity_thinned_breakup_length(
    density: float,
    viscosity: float,
    surface_tension: float,
    velocity: float,
    jet_diameter: float,
    *,
    wavelength: float | None = None,
    constant: float = 10.0,
    gravity: float = 9.80665,
    outside: Outside = "raise",
) -> GravityBreakup:
    """Breakup length of a jet that falls freely, with growth added up along the thinning jet.

    Holds straight downwards for small waves that are there all along. As the jet speeds up and
    thins, a wave on it grows faster, but it is also stretched out of the band where it grows
    best. Among all waves the one that breaks the jet first is taken, unless one is given.

    Parameters
    ----------
    density : float or array
        Density of the liquid [kg/m3].
    viscosity : float or array
        Dynamic viscosity [Pa*s].
    surface_tension : float or array
        Surface tension [N/m].
    velocity : float or array
        Speed of the jet at the nozzle [m/s].
    jet_diameter : float or array
        Diameter of the jet at the nozzle [m].
    wavelength : float or array, keyword-only
        Length at the nozzle of the one wave that grows [m], for a driven jet.
    constant : float or array, keyword-only
        C, the logarithm of jet radius over initial disturbance [-]; 10 by default, uncertain by
        a factor 2.4 for natural jets.
    gravity : float or array, keyword-only
        Acceleration along the jet [m/s2]; 9.80665 by default, 0 for none.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens outside Weber numbers of 2 to 4500 at the nozzle, and for a given wave
        below the cut-off at the nozzle.

    Returns
    -------
    GravityBreakup
        ``length``, ``wavelength`` at the nozzle and ``jet_diameter`` at breakup [m].

    Raises
    ------
    OutOfRange
        Outside those ranges, unless `outside` says otherwise.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    ``C = integral of w(k, a) dt`` along the way of one piece of liquid, ``U = U0 + g t``,
    ``a = a0 (U0/U)^(1/2)``, ``k = k0 U0/U``, ``w`` the larger root of Weber's equation, and 0
    while the wave is still shorter than the circumference of the jet [C, derived here]. The wave is
    the one for which the integral is largest. So the disturbance is one of the
    same share of the radius everywhere; one that comes from the nozzle alone decays at first where
    the best wave starts short, and a strongly stretched jet is then longer, a syrup up to twice.
    Left out are what the stretching itself does to a wave (it matters where the jet thins within
    one wavelength), drag of the air, and the viscous hold-up near the nozzle, within about
    ``(nu^2/g)^(1/3)``. Others found this kind of sum of local growth to miss simulations of
    strongly stretched jets (abstract of Shukla & Gallaire, arXiv 1908.03767).

    References
    ----------
    C. Weber, Z. Angew. Math. Mech. 11 (1931) 136-154, doi:10.1002/zamm.19310110207.
    A. Javadi et al., Phys. Rev. Lett. 110 (2013) 144501.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> syrup = ("1250 kg/m3", "500 mPa*s", "63 mN/m", "0.5 m/s", "1 mm")
    >>> print(f"{jet.gravity_thinned_breakup_length(*syrup).length:.0f}")
    257 millimeter
    >>> print(f"{jet.gravity_thinned_breakup_length(*syrup, gravity=0.0).length:.0f}")
    141 millimeter
    """
    weber: Any = density * velocity * velocity * jet_diameter / surface_tension
    checked: list[tuple[Any, Range]] = [(weber, WEBER)]
    if wavelength is not None:
        checked.append((math.pi * jet_diameter / wavelength, GROWING))
    mask = outside_mask("gravity_thinned_breakup_length", outside, *checked)
    with np.errstate(all="ignore"):
        radius: Any = 0.5 * jet_diameter
        clock = np.sqrt(density / surface_tension * radius) * radius
        ohnesorge = viscosity / np.sqrt(density * surface_tension * radius)
        pull = gravity * clock / velocity
        start = np.nan if wavelength is None else np.pi * jet_diameter / wavelength
        given = np.broadcast_arrays(ohnesorge, pull, constant, start)
        flat = [np.asarray(part, dtype=np.float64).ravel() for part in given]
        times, waves = np.empty_like(flat[0]), np.empty_like(flat[0])
        for first in range(0, times.size, _CHUNK):
            part = slice(first, first + _CHUNK)
            h, g, c, k = (one[part] for one in flat)
            times[part], waves[part] = _solve(h, g, c, k, wavelength is not None)
        shape = given[0].shape
        time, wave = times.reshape(shape), waves.reshape(shape)
        length = velocity * clock * time * (1.0 + 0.5 * pull * time)
        results = (
            length,
            np.pi * jet_diameter / wave,
            jet_diameter * (1.0 + pull * time) ** -0.5,
        )
    # Without a length nothing is known of the rest either.
    unknown: Any = np.isnan(length) | mask
    if not np.ndim(unknown):
        unknown = bool(unknown)
    plain = (value if np.ndim(value) else float(value) for value in results)
    return GravityBreakup(*(blank_outside(value, unknown) for value in plain))


def _solve(h: Any, pull: Any, constant: Any, start: Any, driven: bool) -> tuple[Any, Any]:
    """Time to breakup in capillary times and reduced wavenumber at the nozzle."""
    # From the fastest local growth everywhere, which is too fast: the time starts too short.
    fastest = 1.0 / (2.0 * np.sqrt(2.0) + 6.0 * h)
    time = constant / fastest
    scaled = 1.75 * pull * time
    time = np.where(scaled > 1e-8, ((1.0 + scaled) ** (4.0 / 7.0) - 1.0) / pull, time)
    if driven:
        wave = np.log(start)
    else:
        wave = -0.5 * np.log(2.0 + 3.0 * np.sqrt(2.0) * h)
        wave = wave + 0.75 * np.log1p(pull * time)
    for count in range(_STEPS):
        stretch = np.log1p(pull * time)
        step: Any = 0.0
        if driven:
            gain = _gain(h, pull, time, stretch, wave[None])[0]
        else:
            below, gain, above = _gain(h, pull, time, stretch, wave + _SHIFTS)
            slope = (above - below) / (2.0 * _SHIFT)
            bend = (above + below - 2.0 * gain) / _SHIFT**2
            step = np.where(bend < 0.0, -slope / bend, 0.3 * np.sign(slope))
            step = np.clip(step, -0.3, 0.3)
            if count >= _DAMPED:
                step = 0.5 * step
            wave = wave + step
            gain = gain + np.maximum(step * (slope + 0.5 * step * bend), 0.0)
        rate = _rate(np.exp(2.0 * wave - 3.0 * stretch), h * np.exp(0.25 * stretch))
        rate = rate * np.exp(0.75 * stretch)
        # Growth falls off or sets in along the way: never more than doubled or halved at once.
        wanted = np.clip(time + (constant - gain) / rate, 0.5 * time, 2.0 * time)
        wanted = np.where(rate > 0.0, wanted, 2.0 * time + 0.0 * gain)
        done = np.abs(wanted - time) <= 1e-11 * time
        time = wanted
        if (done & (np.abs(step) < 1e-6) | np.isnan(time)).all():
            break
    return time, np.exp(wave)


def _gain(h: Any, pull: Any, time: Any, stretch: Any, wave: Any) -> Any:
    """The logarithm of growth up to a time, for rows of logarithms of the wavenumber."""
    # In s = ln(U/U0): dt = exp(s) ds/pull, and the growth rate has its local clock. A wave shorter
    # than the circumference waits until it is stretched; there growth sets in as a root, so that
    # squares of the nodes serve best.
    turn = np.clip(wave / 1.5, 0.0, stretch)
    squared = np.exp(2.0 * wave)
    quarter = np.exp(0.25 * (turn + (stretch - turn) * _SQUARES))
    cube = quarter * quarter * quarter
    sixth = cube * cube
    rate = _rate(squared / (sixth * sixth), h * quarter)
    total = (stretch - turn) * (_MASSES * rate * (sixth * quarter)).sum(axis=0)
    # Without gravity the stretch is 0, and over pull it is the time.
    falls = pull * time > 1e-8
    still = _rate(squared, h) * time
    return np.where(falls, total / np.where(falls, pull, 1.0), still)


def _rate(squared: Any, h: Any) -> Any:
    """The larger root of Weber's equation in local capillary times; 0 beyond the cut-off."""
    damping = 1.5 * h * squared
    drive = np.maximum(0.5 * squared * (1.0 - squared), 0.0)
    return drive / (damping + np.sqrt(damping * damping + drive))
