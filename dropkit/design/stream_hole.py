"""The hole of a stream: which models give its jet and its pressure, for arrays of designs."""

from __future__ import annotations

import math
from dataclasses import dataclass
from typing import Any, Final, NamedTuple

import numpy as np

from dropkit.errors import BadInput
from dropkit.models import nozzle

__all__ = ["HOLES", "Hole", "HoleKind", "PressureParts", "hole_kind"]

TURBULENT_JET: Final = 0.9899494937  # seventh-root profile, balance of momentum
ORIFICE_JET: Final = math.sqrt(0.62)
LAMINAR_END: Final = 2100.0
TURBULENT_START: Final = 4000.0
_STEPS: Final = 30


class PressureParts(NamedTuple):
    """Gauge pressure ahead of a hole, the sum of its parts [Pa].

    Parameters
    ----------
    total, kinetic, entry, viscous, capillary : float or array
        As the pressure models of the family ``nozzle`` part it.
    """

    total: Any
    kinetic: Any
    entry: Any
    viscous: Any
    capillary: Any


@dataclass(frozen=True, slots=True)
class HoleKind:
    """One kind of hole: its models, the length it has by default, and what they hold for.

    Parameters
    ----------
    name : str
        The word that `stream` takes.
    length_ratio : float
        Length over diameter where none is given.
    shortest, longest : float
        Length over diameter between which its models hold.
    words : str
        What it is.
    sources : tuple of str
        Of its models.
    """

    name: str
    length_ratio: float
    shortest: float
    longest: float
    words: str
    sources: tuple[str, ...]


HOLES: Final[dict[str, HoleKind]] = {
    "tube": HoleKind(
        "tube", 10.0, 1.5, math.inf, "a tube with a sharp entry; laminar friction with its entrance "
        "region, turbulent above a Reynolds number of 4000, joined between 2100 and 4000",
        ("Shah1978", "MiddlemanGavis1961", "Harmon1955"),
    ),
    "hole": HoleKind(
        "hole", 4.0, 1.5, 10.0, "a drilled hole with sharp edges that the jet fills",
        ("Lichtarowicz1965",),
    ),
    "plate": HoleKind(
        "plate", 0.2, 0.0, 0.5, "a sharp-edged hole in a plate thinner than half its diameter",
        ("Sampson1891", "Britannica1911"),
    ),
}  # fmt: skip


def _share_turbulent(reynolds: Any) -> Any:
    """0 for laminar, 1 for turbulent flow, and a smooth step in the logarithm between."""
    span = math.log(TURBULENT_START / LAMINAR_END)
    with np.errstate(all="ignore"):
        x = np.clip(np.log(reynolds / LAMINAR_END) / span, 0.0, 1.0)
    return x * x * (3.0 - 2.0 * x)


@dataclass(frozen=True, slots=True)
class Hole:
    """A kind of hole with its length, for arrays of designs.

    Parameters
    ----------
    kind : HoleKind
        Tube, drilled hole, or thin plate.
    length : array or None
        Length [m]; None for `length_ratio` diameters.
    length_ratio : float or array
        Length over diameter, where no length is given [-].
    contraction : array or None
        Diameter of the jet over that of the hole, where the rig's own is known [-].
    entry_loss : float or array
        Loss at the entry of a tube, in units of ``rho U^2/2`` [-].
    discharge_coefficient : array or None
        The rig's own; replaces the pressure models [-].
    """

    kind: HoleKind
    length: Any = None
    length_ratio: Any = 10.0
    contraction: Any = None
    entry_loss: Any = 0.5
    discharge_coefficient: Any = None

    def length_of(self, diameter: Any) -> Any:
        """Length of a hole of some diameter."""
        return self.length_ratio * diameter if self.length is None else self.length + 0.0 * diameter

    def contraction_of(self, density: Any, viscosity: Any, flow: Any, diameter: Any) -> Any:
        """Diameter of the jet over that of the hole, once its profile is flat."""
        reynolds = 4.0 * density * flow / (math.pi * viscosity * diameter)
        if self.contraction is not None:
            return self.contraction + 0.0 * reynolds
        if self.kind.name == "plate":
            return ORIFICE_JET + 0.0 * reynolds
        if self.kind.name == "hole":
            return 1.0 + 0.0 * reynolds
        speed = 4.0 * flow / (math.pi * diameter * diameter)
        laminar = nozzle.jet_diameter_laminar_tube.si(
            density, viscosity, speed, diameter, outside="allow"
        ).diameter
        share = _share_turbulent(reynolds)
        return (1.0 - share) * laminar / diameter + share * TURBULENT_JET

    def diameter_of(
        self, density: Any, viscosity: Any, flow: Any, jet_diameter: Any, steps: int = _STEPS
    ) -> Any:
        """Diameter of the hole behind a jet: the inverse of the contraction.

        Secants, in logarithms: the contraction falls less than the diameter rises.
        """
        target = np.log(jet_diameter)

        def excess(y: Any) -> Any:
            narrow = self.contraction_of(density, viscosity, flow, np.exp(y))
            return y + np.log(narrow) - target

        with np.errstate(all="ignore"):
            before = target + 0.1
            miss = excess(before)
            now = before - miss
            for _ in range(steps):
                its = excess(now)
                slope = (its - miss) / (now - before)
                # A slope outside what contractions have means the last digit was reached.
                slope = np.where((slope > 0.5) & (slope < 1.5), slope, 1.0)
                before, miss = now, its
                now = now - its / slope
                if not np.any(np.abs(now - before) > 1e-15 * np.abs(now)):
                    break
            return np.exp(now)

    def pressure(
        self, density: Any, viscosity: Any, surface_tension: Any, flow: Any, diameter: Any
    ) -> PressureParts:
        """Gauge pressure that a flow needs, in its parts, whether the models hold or not."""
        liquid = (density, viscosity, surface_tension)
        contraction = self.contraction_of(density, viscosity, flow, diameter)
        length = self.length_of(diameter)
        if self.discharge_coefficient is not None:
            total, kinetic, lost, capillary = nozzle.pressure_from_coefficient.si(
                density, surface_tension, flow, diameter, self.discharge_coefficient,
                contraction=contraction,
            )  # fmt: skip
            return PressureParts(total, kinetic, lost, 0.0 * total, capillary)
        rest = {"contraction": contraction, "outside": "allow"}
        if self.kind.name == "plate":
            return PressureParts(
                *nozzle.pressure_thin_plate.si(*liquid, flow, diameter, length, **rest)
            )
        if self.kind.name == "hole":
            return PressureParts(
                *nozzle.pressure_long_orifice.si(*liquid, flow, diameter, length, **rest)
            )
        rest["entry_loss"] = self.entry_loss
        laminar = nozzle.pressure_developing_tube.si(*liquid, flow, diameter, length, **rest)
        share = _share_turbulent(4.0 * density * flow / (math.pi * viscosity * diameter))
        if not np.any(share > 0.0):
            return PressureParts(*laminar)
        turbulent = nozzle.pressure_turbulent_tube.si(*liquid, flow, diameter, length, **rest)
        parts = zip(laminar[1:], turbulent[1:], strict=True)
        joined = [(1.0 - share) * one + share * other for one, other in parts]
        return PressureParts(joined[0] + joined[1] + joined[2] + joined[3], *joined)


def hole_kind(name: str) -> HoleKind:
    """The kind of hole of a name, with the choices where there is none."""
    if not isinstance(name, str) or name not in HOLES:
        raise BadInput(
            f"nozzle_kind={name!r} is not known",
            allowed="; ".join(f"{each.name!r}, {each.words}" for each in HOLES.values()),
        )
    return HOLES[name]
