"""A solvent with a dissolved polymer: `thickened`, and the fluid that it gives."""

from __future__ import annotations

import math
from collections.abc import Callable, Sequence
from dataclasses import replace
from typing import Any, Final

import numpy as np

from dropkit import records, units
from dropkit.errors import BadInput, MissingProperty, OutOfRange
from dropkit.properties import display
from dropkit.properties.curves import FloatArray
from dropkit.properties.interface import Fluid
from dropkit.properties.mixtures import Mixture
from dropkit.properties.property_words import PROPERTIES
from dropkit.properties.pure import Liquid, liquid
from dropkit.properties.thickening import ROOM, Chosen, Thickener, thickener
from dropkit.properties.trails import record_use
from dropkit.provenance import Grade, Trail, worst_grade
from dropkit.records import PropertyRecord
from dropkit.validity import Range

__all__ = ["Thickened", "thickened"]

SOLVENT: Final = "water"
SALT: Final = "sodium_chloride"
# What a per cent of polymer leaves nearly as it was; the rest is not given.
KEPT: Final = ("density", "surface_tension", "vapour_pressure", "heat_of_vaporisation",
               "heat_capacity")  # fmt: skip
LEAST_ASSUMED: Final = 0.05  # standard uncertainty of a surface tension that was not measured
# Of the polymer's share of the mass, what may be missing in a property that leaves it out (k = 1).
SHARE: Final = 0.5

ELASTIC: Final = (
    "zero-shear viscosity: polymer solutions thin with shear, and in a nozzle the shear is high"
)
STRETCH: Final = (
    "elastic: threads of polymer solutions live longer than their viscosity says; no relaxation "
    "time is given, because no source of its prefactor was seen"
)


def thickened(
    solvent: Any,
    polymer: Any,
    *,
    concentration: Any,
    molar_mass: Any = None,
    intrinsic_viscosity: Any = None,
    salt: Any = None,
    uncertainty: Any = None,
    entry: int | None = None,
) -> Thickened:
    """A solvent with a dissolved polymer, whose viscosity follows from published coils.

    Holds for zero shear, in water (or in water with sodium chloride), up to the largest product
    of concentration and intrinsic viscosity that was measured.

    Parameters
    ----------
    solvent : str or Fluid
        Water, or a mixture of water and sodium chloride; with your own `intrinsic_viscosity`
        any fluid, for which the law over concentration is then taken from water.
    polymer : str or Thickener
        Such as ``"sodium alginate"`` or ``"PEO"``.
    concentration : number or with a unit
        Mass of polymer in a volume of solution [kg/m3], such as ``"0.5 g/dL"``.
    molar_mass : number or with a unit, optional
        Weight average [kg/mol], such as ``"100 kDa"``; this or `intrinsic_viscosity`.
    intrinsic_viscosity : number or with a unit, optional
        Measured on your own lot in the same salt solution [m3/kg], such as ``"540 mL/g"``.
    salt : number or with a unit, optional
        Concentration of sodium chloride [mol/m3]; by default that of the solvent. Given beside
        plain water, it counts for the coils alone: the salt's own effect on the solvent is not in.
    uncertainty : number, optional
        Relative standard uncertainty (k = 1) of your own `intrinsic_viscosity`.
    entry : int, optional
        Number of the entry in ``thickener(...).table()``; by default the first that serves.

    Returns
    -------
    Thickened
        A fluid as any other, with its viscosity replaced.

    Raises
    ------
    UnknownName
        No such polymer is held.
    MissingProperty
        No entry serves that molar mass, salt or solvent; says which there are.
    OutOfRange
        The concentration is beyond what was measured; says what is allowed.
    BadInput
        Both or neither of molar mass and intrinsic viscosity, salt given twice.

    Notes
    -----
    With x = c[eta], Martin's equation is mu/mu_s = 1 + x exp(k x), Huggins' mu/mu_s =
    1 + x + k x^2. The uncertainty is that of the law and that of [eta], which weighs the more
    the thicker the solution is.

    Examples
    --------
    >>> import dropkit as dk
    >>> ink = dk.thickened(
    ...     "water",
    ...     "sodium alginate",
    ...     concentration="0.5 g/dL",
    ...     molar_mass="100 kDa",
    ...     salt="0.1 mol/L",
    ... )
    >>> print(f"{ink.viscosity('20 degC'):.2f}")
    4.26 millipascal * second
    """
    base = liquid(solvent) if isinstance(solvent, str) else solvent
    if not isinstance(base, Fluid) or isinstance(base, Thickened):
        raise BadInput(
            f"the solvent is {type(solvent).__name__}",
            allowed="the name of a liquid, a liquid, a mixture or a fluid of your own",
        )
    chain = polymer if isinstance(polymer, Thickener) else thickener(polymer)
    if "viscosity" not in base.available():
        raise base._missing("viscosity")
    held = _salt_of(base)
    if held is None and intrinsic_viscosity is None:
        raise MissingProperty(
            f"intrinsic viscosities of {chain.name} were seen in water only, not in {base.name}",
            allowed="water, or water with sodium chloride",
            hint="Measured in this solvent, it goes in as intrinsic_viscosity='... mL/g'",
        )
    if salt is not None and held:
        raise BadInput("the solvent brings its own salt", allowed="salt, or a solvent with salt")
    amount: Any = (held or 0.0) if salt is None else salt
    chosen = chain.chosen(
        molar_mass=molar_mass,
        intrinsic_viscosity=intrinsic_viscosity,
        salt=amount,
        uncertainty=uncertainty,
        entry=entry,
    )
    share = units.single(concentration, "mass_concentration", "concentration")
    _check_concentration(chain, chosen, share)
    notes = [f"c[eta] = {share * float(chosen.chain.intrinsic_at(ROOM)):.3g} at 25 degC"]
    if held is None:
        notes.append("the law over concentration is that in water")
    if salt is not None and units.single(salt, "molar_concentration", "salt") > 0.0:
        notes.append("the salt's own effect on the solvent is not included")
    return Thickened(base, chain, chosen, share, tuple(notes))


def _salt_of(base: Fluid) -> float | None:
    """Sodium chloride in the solvent [mol/m3]; None where it is no salt water."""
    if isinstance(base, Liquid):
        return 0.0 if base.key == SOLVENT else None
    if not isinstance(base, Mixture) or not set(base.components) <= {SOLVENT, SALT}:
        return None
    fraction = base.mass_fractions.get(SALT, 0.0)
    if np.ndim(fraction):
        raise BadInput("the solvent has an array of compositions", allowed="one composition")
    density = base._evaluate("density", ROOM, "raise")
    return float(fraction * density / records.liquid_record(SALT).molar_mass)


def _check_concentration(chain: Thickener, chosen: Chosen, share: float) -> None:
    thickest = float(chosen.chain.intrinsic_at(chosen.entry.range.low))
    most = chosen.chain.limit / thickest
    if share > most:
        raise OutOfRange(
            f"{chain.name}: {share:g} kg/m3 is c[eta] = {share * thickest:.3g}, beyond what was "
            "measured",
            allowed=f"up to {most:.3g} kg/m3, where c[eta] is {chosen.chain.limit:g}",
            hint="A thicker solution goes in by its measured viscosity: with_values(viscosity=...)",
        )


class Thickened(Fluid):
    """A solvent whose viscosity a dissolved polymer raises.

    Made by `thickened`; see there for an example.

    Parameters
    ----------
    base : Fluid
        The solvent.
    polymer : Thickener
        The polymer.
    chosen : Chosen
        The entry that serves, with intrinsic viscosity and law.
    concentration : float
        Mass of polymer in a volume of solution [kg/m3].
    notes : tuple of str
        What was taken for granted.
    """

    def __init__(
        self,
        base: Fluid,
        polymer: Thickener,
        chosen: Chosen,
        concentration: float,
        notes: tuple[str, ...],
    ) -> None:
        super().__init__()
        self._base, self._chosen, self._notes = base, chosen, notes
        self.polymer = polymer
        self.concentration = concentration
        self.name = f"{base.name} with {concentration:.4g} kg/m3 {polymer.name}"

    def __getstate__(self) -> dict[str, Any]:
        # The quick evaluators are functions of the moment; they are made again on use.
        return {**self.__dict__, "_fast": {}}

    def relative_viscosity(self, temperature: Any = ROOM) -> Any:
        """Viscosity over that of the solvent.

        Holds at zero shear.

        Parameters
        ----------
        temperature : float, array or with a unit
            Temperature [K]; it matters only where the entry says how the coils change with it.

        Returns
        -------
        float or ndarray
            Relative viscosity [-].

        Raises
        ------
        BadInput
            No temperature.

        Examples
        --------
        >>> import dropkit as dk
        >>> ink = dk.thickened("water", "PEO", concentration="1 g/L", molar_mass="1000 kDa")
        >>> round(ink.relative_viscosity(), 2)
        1.86
        """
        kelvin = units.to_si(temperature, "temperature", "temperature")
        found = self._chosen.chain.relative(self.concentration, kelvin)
        return float(found) if np.ndim(found) == 0 else found

    # ------------------------------------------------ what Fluid asks for
    def available(self) -> tuple[str, ...]:
        """Names of the properties that can be given.

        Returns
        -------
        tuple of str
            In the order of tables; no surface tension where the polymer is surface active.
        """
        held = {prop for prop in self._base.available() if prop in KEPT}
        if self.polymer.record.surface_active:
            held.discard("surface_tension")
        held.add("viscosity")
        if "density" in held:
            held.add("kinematic_viscosity")
        return tuple(prop for prop in PROPERTIES if prop in held)

    def _missing(self, prop: str) -> MissingProperty:
        if prop == "surface_tension" and self.polymer.record.surface_active:
            return MissingProperty(
                f"no surface tension of {self.name}: {self.polymer.name} is surface active "
                f"({self.polymer.record.surface_reason})",
                allowed="it has " + ", ".join(self.available()),
                hint="Measured, it goes in with with_values(surface_tension='... mN/m')",
            )
        return super()._missing(prop)

    @property
    def cautions(self) -> tuple[str, ...]:
        """Those of the solvent and of the polymer, and what a viscosity does not say."""
        texts = (*self._base.cautions, *self.polymer.cautions, ELASTIC, STRETCH)
        return tuple(dict.fromkeys(texts))

    def _record_range(self, prop: str) -> Range:
        limits = self._base._range(prop)
        if prop != "viscosity":
            return limits
        entry = self._chosen.entry.range
        low, high = max(limits.low, entry.low), min(limits.high, entry.high)
        if low > high:
            raise MissingProperty(
                f"{self.name}: the polymer was measured at {entry}, {self._base.name} at {limits}"
            )
        return Range(low, high)

    def _record_blocks(self, prop: str) -> Sequence[PropertyRecord]:
        return self._base._blocks(prop)

    def _shape(self) -> tuple[int, ...]:
        return self._base._shape()

    def _broadcast(self, shape: tuple[int, ...]) -> Fluid:
        wide = self._base._broadcast(shape)
        if wide is self._base:
            return self
        return Thickened(wide, self.polymer, self._chosen, self.concentration, self._notes)

    def _record_scalar(self, prop: str) -> Callable[[float], float] | None:
        value = self._base._scalar(prop)
        if prop != "viscosity" or value is None:
            return value
        chain, share, inner = self._chosen.chain, self.concentration, value
        return lambda temperature: inner(temperature) * float(chain.relative(share, temperature))

    def _record_fill(
        self, prop: str, part: slice, temperature: FloatArray, out: FloatArray
    ) -> None:
        self._base._fill(prop, part, temperature, out)
        if prop == "viscosity":
            out *= self._chosen.chain.relative(self.concentration, temperature)

    def _without_gaps(self, prop: str) -> bool:
        return self._base._without_gaps(prop)

    def _composition_is_settled(self) -> bool:
        return self._base._composition_is_settled()

    def _record_settle(self, prop: str, temperature: Any, outside: str) -> Any:
        return self._base._settle_point(prop, temperature, outside)

    def _record_trail(self, prop: str, temperature: float | FloatArray | None) -> Trail:
        trail = self._base._trail(prop, temperature)
        if prop == "viscosity":
            return self._viscosity_trail(trail, temperature)
        text = f"{prop} is that of {self._base.name}, the polymer left out"
        spread = trail.uncertainty
        if spread is not None:
            spread = math.hypot(spread, SHARE * self.concentration / 1000.0)
            if prop == "surface_tension":
                spread = max(spread, LEAST_ASSUMED)
        return replace(
            trail,
            subject=self.name,
            grade="estimated",
            uncertainty=spread,
            assumptions=(*trail.assumptions, text),
        )

    def _viscosity_trail(self, trail: Trail, temperature: float | FloatArray | None) -> Trail:
        chosen = self._chosen
        entry, chain = chosen.entry, chosen.chain
        kelvin = entry.range.low if temperature is None else temperature
        spread = None
        if trail.uncertainty is not None and chosen.uncertainty is not None:
            steep = float(np.nanmax(np.asarray(chain.steepness(self.concentration, kelvin))))
            law = float(entry.parameters["law_uncertainty"])
            spread = math.hypot(trail.uncertainty, law, steep * chosen.uncertainty)
        grades: list[Grade] = [trail.grade, entry.grade]
        if chosen.own:
            grades.append("own")
        return replace(
            trail,
            subject=self.name,
            method=f"{trail.method}; raised by {chain.describe()}",
            grade=worst_grade(grades),
            uncertainty=spread,
            records=(*trail.records, record_use(entry)),
            assumptions=(*trail.assumptions, *self._notes),
            cautions=tuple(dict.fromkeys((*trail.cautions, *entry.cautions, ELASTIC, STRETCH))),
        )

    def __repr__(self) -> str:
        return display.fluid_text(self, f"Fluid {self.name}")

    def _repr_html_(self) -> str:
        return display.fluid_html(self, f"Fluid {self.name}")
