"""The published curves of the drop weight factor, and the solution of the drop weight for them.

With psi(phi) the factor, phi = r/V^(1/3) and Bo = drho g r^2/gamma on the radius of the tip, the
drop weight ``V drho g = 2 pi r gamma psi`` is ``phi^3 psi(phi) = Bo/(2 pi)`` for a given tip and
``phi psi(phi) = drho g V^(2/3)/(2 pi gamma)`` for a given drop. Both left sides rise with phi.
"""

from __future__ import annotations

import math
from collections.abc import Callable
from dataclasses import dataclass
from typing import Any, Final, Literal, TypeAlias

import numpy as np

from dropkit.errors import BadInput, Unphysical
from dropkit.models.published import Published, blank_outside, outside_mask
from dropkit.validity import Range, check_outside, settle

Factor: TypeAlias = Literal["table", "quadratic", "polynomial", "power"]

WHAT: Final = "the tip radius over the cube root of the drop volume"

# Harkins & Brown 1919 [M+]; the first entry is the limit of a vanishing tip.
_PHI: Final = np.array([0.0, *(0.30 + 0.05 * k for k in range(19))])
_PSI: Final = np.array(
    [1.0000, 0.7256, 0.7011, 0.6828, 0.6669, 0.6515, 0.6362, 0.6250, 0.6171, 0.6093,
     0.6032, 0.6000, 0.5992, 0.5998, 0.6034, 0.6098, 0.6179, 0.6280, 0.6407, 0.6535]
)  # fmt: skip
_SLOPE: Final = np.diff(_PSI) / np.diff(_PHI)

# Heertjes et al. 1971 [S2], F = 1/(2 pi psi).
_F0, _F1, _F2 = 0.14782, 0.27896, -0.1662
# Lee, Chan & Pogaku 2008 [M+], rising powers.
_LEE: Final = (1.0, -0.9121, -2.109, 13.38, -27.29, 27.53, -13.58, 2.593)
# Yildirim, Xu & Basaran 2005 [M+], Bo = 3.60 phi^2.81.
_Y0, _Y1 = 3.60, 2.81


def table(phi: Any) -> tuple[Any, Any]:
    """psi and its slope by Harkins & Brown's table, straight between its entries."""
    place = np.clip(np.searchsorted(_PHI, phi, side="right") - 1, 0, _SLOPE.size - 1)
    return _PSI[place] + _SLOPE[place] * (phi - _PHI[place]), _SLOPE[place]


def quadratic(phi: Any) -> tuple[Any, Any]:
    """psi and its slope by Heertjes et al."""
    form = _F0 + phi * (_F1 + phi * _F2)
    psi = 1.0 / (2.0 * math.pi * form)
    return psi, -psi * (_F1 + 2.0 * _F2 * phi) / form


def polynomial(phi: Any) -> tuple[Any, Any]:
    """psi and its slope by Lee, Chan & Pogaku."""
    psi = slope = 0.0 * phi
    for coefficient in reversed(_LEE):
        slope = slope * phi + psi
        psi = psi * phi + coefficient
    return psi, slope


def power(phi: Any) -> tuple[Any, Any]:
    """psi and its slope by Yildirim, Xu & Basaran."""
    psi = _Y0 / (2.0 * math.pi) * phi ** (_Y1 - 3.0)
    return psi, (_Y1 - 3.0) * psi / phi


@dataclass(frozen=True, slots=True)
class Curve:
    """One published curve with the range of phi that it is used in."""

    psi: Callable[[Any], tuple[Any, Any]]
    low: float
    high: float

    def bond(self) -> Range:
        """The range as Bond numbers on the tip radius, which is known before the drop is."""
        return Range(
            self._bond(self.low),
            self._bond(self.high) * (1.0 + 1e-12),
            "the Bond number drho g r^2/gamma on the tip's radius",
            "",
        )

    def _bond(self, phi: float) -> float:
        return 2.0 * math.pi * phi**3 * float(self.psi(phi)[0]) if phi else 0.0


# The limits of the power law are not remembered: it is used where it was compared.
CURVES: Final[dict[str, Curve]] = {
    "table": Curve(table, 0.0, 1.2),
    "quadratic": Curve(quadratic, 0.3, 1.2),
    "polynomial": Curve(polynomial, 0.0, 1.2),
    "power": Curve(power, 0.1, 0.8),
}


def share(phi: Any, curve: Curve) -> Any:
    """psi of a curve, a float for a float."""
    with np.errstate(all="ignore"):
        psi = curve.psi(phi)[0]
    return psi if isinstance(phi, np.ndarray) else float(psi)


def curve_of(factor: str) -> Curve:
    """The curve of a word; BadInput for another."""
    if not isinstance(factor, str) or factor not in CURVES:
        raise BadInput(f"factor={factor!r} is not known", allowed=", ".join(map(repr, CURVES)))
    return CURVES[factor]


def solve(target: Any, exponent: int, curve: Curve) -> Any:
    """phi from ``phi^exponent psi(phi) = target``, by Newton in logarithms; NaN where it fails.

    There the left side is nearly a straight line, so that a handful of steps reach rounding.
    """
    with np.errstate(all="ignore"):
        wanted = np.log(np.asarray(target, dtype=np.float64))
        u = (wanted + 0.45) / exponent
        for _ in range(50):
            phi = np.exp(u)
            psi, slope = curve.psi(phi)
            step = (wanted - exponent * u - np.log(psi)) / (exponent + phi * slope / psi)
            u = u + step
            if not np.any(np.abs(step) > 4e-15 * (1.0 + np.abs(u))):
                break
        found = np.where(np.abs(step) < 1e-12 * (1.0 + np.abs(u)), np.exp(u), np.nan)
    return float(found) if found.ndim == 0 else found


def tip_ratio_of_bond(subject: str, bond: Any, factor: str, outside: str) -> tuple[Any, Any]:
    """phi of the drop from a tip with this Bond number on its radius, and what must be NaN."""
    curve = curve_of(factor)
    check_outside(outside)
    hint = (
        "factor='table' or 'polynomial' reaches down to 0"
        if curve.low and not bool(np.all(bond >= curve.bond().low))
        else "A tip as wide as that holds a pool, not a drop; outside='warn', 'nan' or 'allow' "
        "changes what happens"
    )
    mask = settle(subject, bond, curve.bond(), outside, hint=hint)
    return solve(bond / (2.0 * math.pi), 3, curve), mask


def tip_ratio_of_drop(subject: str, weight: Any, factor: str, outside: str) -> tuple[Any, Any]:
    """phi of the tip for a drop of weight number ``drho g V^(2/3)/gamma``, and what must be NaN."""
    curve = curve_of(factor)
    check_outside(outside)
    low, high = (
        2.0 * math.pi * phi * float(curve.psi(phi)[0]) if phi else 0.0
        for phi in (curve.low, curve.high)
    )
    limits = Range(low, high * (1.0 + 1e-12), "drho g V^(2/3)/gamma of the drop", "")
    mask = settle(
        subject,
        weight,
        limits,
        outside,
        hint="Drops larger than that fall from no tip: the widest that the curves know is 1.2 times "
        "the cube root of the volume in radius"
        if not bool(np.all(weight <= high))
        else "factor='table' or 'polynomial' reaches down to 0",
    )
    return solve(weight / (2.0 * math.pi), 1, curve), mask


def buoyant(density: Any, outer_density: Any) -> Any:
    """The difference of densities that moves a drop; Unphysical where there is none."""
    weight = abs(density - outer_density)
    if bool(np.any(weight == 0.0)):
        raise Unphysical(
            "density and outer_density are equal: such a drop neither sinks nor rises",
            allowed="two different densities",
        )
    return weight


def volume_of_tip(
    subject: str,
    density: Any,
    tension: Any,
    tip_diameter: Any,
    gravity: Any,
    factor: str,
    outside: str,
) -> Any:
    """Volume of the drop from a tip; `density` is that which weighs, less that around it."""
    radius = 0.5 * tip_diameter
    bond = density * gravity * radius * radius / tension
    phi, mask = tip_ratio_of_bond(subject, bond, factor, outside)
    return blank_outside((radius / phi) ** 3, mask)


def tip_of_volume(
    subject: str,
    density: Any,
    tension: Any,
    volume: Any,
    gravity: Any,
    factor: str,
    outside: str,
) -> Any:
    """Diameter of the tip that gives a drop of this volume."""
    edge = volume ** (1.0 / 3.0)
    phi, mask = tip_ratio_of_drop(
        subject, density * gravity * edge * edge / tension, factor, outside
    )
    return blank_outside(2.0 * phi * edge, mask)


def tension_of_volume(
    subject: str,
    density: Any,
    volume: Any,
    tip_diameter: Any,
    gravity: Any,
    factor: str,
    outside: str,
) -> Any:
    """Tension of the liquid whose drop of this volume fell from a tip: no equation to solve."""
    curve = curve_of(factor)
    radius = 0.5 * tip_diameter
    phi = radius / volume ** (1.0 / 3.0)
    mask = outside_mask(subject, outside, (phi, Range(curve.low, curve.high, WHAT, "")))
    tension = density * gravity * volume / (2.0 * math.pi * radius * share(phi, curve))
    return blank_outside(tension, mask)


def statement(
    gives: str, *, place: str, mark: str = "M+", extra: tuple[str, ...] = ()
) -> Published:
    """The statement of the functions that use every curve."""
    return Published(
        gives=gives,
        holds="drops that form slowly (a minute each for 1 %) at a clean, level, circular tip of a "
        "liquid of low viscosity; satellites counted in; tension at its value of equilibrium",
        sources=(
            "HarkinsBrown1919",
            "Tate1864",
            "Heertjes1971",
            "LeeChanPogaku2008",
            "Yildirim2005",
            "Rayleigh1899",
            "Eschbaum1895",
            "StandardDropper",
            *extra,
        ),
        mark=mark,
        place=place,
        ranges=(Range(0.0, 1.2, WHAT, ""),),
        agreement="Rayleigh 1899, 7 slow water drops, phi 0.45 to 1.13: bias -0.1 %, rms 1.0 % of the "
        "table; dropping by the second, drops are heavier: standard dropper, water, ethanol and "
        "ether, +5, +10 and +12 %; Eschbaum 1895, rate not told, water from 6 tips: -3 to +9 %",
    )
