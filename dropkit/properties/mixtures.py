"""Mixtures of dropkit's liquids and solutes, and `mixture`, which makes them."""

from __future__ import annotations

from collections.abc import Callable, Mapping, Sequence
from typing import Any, Final, Literal

import numpy as np

from dropkit import records, units
from dropkit.errors import (
    BadInput,
    EstimateRefused,
    EstimateWarning,
    MissingProperty,
    OutOfRange,
    RangeWarning,
    warn_user,
)
from dropkit.properties import display
from dropkit.properties.cautions import mixture_cautions, mixture_phases
from dropkit.properties.composition import (
    Composition,
    awoken,
    check_basis,
    from_mass,
    read_composition,
)
from dropkit.properties.curves import FloatArray
from dropkit.properties.interface import Fluid
from dropkit.properties.mixing.blends import Blend, blend
from dropkit.properties.mixing.miscibility import check_mixable, taken_for_granted
from dropkit.properties.mixing.redlich_kister import RULES
from dropkit.properties.property_words import GRADED, PROPERTIES, QUOTIENT
from dropkit.properties.pure import Liquid
from dropkit.properties.trails import record_use, relative_uncertainty, versions
from dropkit.provenance import GRADES, Trail, worst_grade
from dropkit.validity import Range, settle

__all__ = ["Mixture", "mixture"]

ESTIMATES: Final = ("warn", "allow", "refuse")


def mixture(
    components: Mapping[str, Any],
    *,
    by: str | None = None,
    normalise: bool = False,
    measured_at: Any = 293.15,
    estimates: Literal["warn", "allow", "refuse"] = "warn",
) -> Mixture:
    """A mixture by composition.

    Parameters
    ----------
    components : mapping of str to amount, fraction or "rest"
        Amounts with units (``"62 g"``, ``"250 mL"``, ``"2 mol"``) fix the basis and are
        normalised; ``"38 %"`` and bare fractions need `by`; ``"rest"`` is one minus the
        others. Fractions may be arrays that broadcast.
    by : {"mass", "mole", "volume"}, optional
        Basis of fractions; there is no default. ``"volume"`` means volumes before mixing.
    normalise : bool
        Accept fractions whose sum misses 1 by up to 0.002.
    measured_at : temperature
        Where volumes were measured [K]; 20 degC by default, listed under assumptions.
    estimates : {"warn", "allow", "refuse"}
        What to do where a pair has no measured record: warn once, say nothing, or
        refuse the property.

    Returns
    -------
    Mixture
        With every property as a method of temperature.

    Raises
    ------
    CompositionError, BasisMissing
        A composition that does not add up, or has no basis.
    UnknownName, AmbiguousName
        A component that is not known.
    NotALiquid
        Nothing but solids.

    Examples
    --------
    >>> import dropkit as dk
    >>> ink = dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass")
    >>> 1e3 < ink.density(293.15) < 1.2e3
    True
    """
    composition = read_composition(components, by=by, normalise=normalise, measured_at=measured_at)
    return Mixture(composition, estimates=estimates)


class Mixture(Fluid):
    """Liquids and dissolved solids at stated mass fractions.

    Made by `mixture`; see there for an example.

    Parameters
    ----------
    composition : Composition
        Mass fractions of the components.
    estimates : {"warn", "allow", "refuse"}
        What to do where a pair has no measured record.
    quiet : bool
        Whether the warning of estimates is left out.
    """

    def __init__(
        self,
        composition: Composition,
        *,
        estimates: Literal["warn", "allow", "refuse"] = "warn",
        quiet: bool = False,
    ) -> None:
        super().__init__()
        if not isinstance(estimates, str) or estimates not in ESTIMATES:
            raise BadInput(
                f"estimates={estimates!r} is not known", allowed="'warn', 'allow' or 'refuse'"
            )
        self._composition = composition
        self._estimates = estimates
        # An empty array of compositions keeps all its components.
        present = [np.size(w) == 0 or np.any(np.asarray(w) > 0.0) for w in composition.fractions]
        self._keys = tuple(k for k, here in zip(composition.keys, present, strict=True) if here)
        self._mass = tuple(
            w for w, here in zip(composition.fractions, present, strict=True) if here
        )
        entries = [records.liquid_record(key) for key in self._keys]
        check_mixable(entries)
        self._pure = Liquid(entries[0]) if len(entries) == 1 else None
        self.name = self._title(entries)
        self._blends: dict[str, Blend | MissingProperty] = {}
        if estimates == "warn" and not quiet:
            self._warn()

    def __reduce__(self) -> tuple[Any, ...]:
        return (_rebuild, (self._composition, self._estimates))

    def grade_codes(self, prop: str, temperature: FloatArray) -> Any:
        """Grade of a property point by point; for dropkit's own layers.

        Parameters
        ----------
        prop : str
            A property that the mixture has.
        temperature : ndarray
            Temperatures [K], in the shape of the composition.

        Returns
        -------
        ndarray of int
            Places in `GRADES`, in the same shape.

        Raises
        ------
        MissingProperty
            The mixture does not have it.
        """
        if prop == "kinematic_viscosity":
            codes = [self.grade_codes(name, temperature) for name in ("viscosity", "density")]
            return np.maximum(*codes)
        if self._pure is not None:
            curve = self._pure.curve(prop)
            grades = np.array([GRADES.index(block.grade) for block in curve.records])
            return grades[curve.serve(temperature)]
        return self._need(prop).grade_codes(self._mass, temperature)

    def _title(self, entries: list[records.LiquidRecord]) -> str:
        parts = []
        for entry, w in zip(entries, self._mass, strict=True):
            share = f"{100 * w:.4g} %" if np.ndim(w) == 0 else "array"
            parts.append(f"{entry.name} {share}")
        return " + ".join(parts) + " by mass" if len(parts) > 1 else entries[0].name

    def _warn(self) -> None:
        estimated, refused = [], []
        for prop in GRADED:
            found = self._blend(prop) if self._pure is None else None
            if isinstance(found, EstimateRefused):
                refused.append(prop)
            elif isinstance(found, Blend) and found.estimated:
                share = f"{prop} (+-{200 * found.estimate_error(self._mass):.2g} %)"
                estimated.append(share)
        if not (estimated or refused):
            return
        text = f"{self.name}: pairs without measured records."
        if estimated:
            text += f" Estimated: {', '.join(estimated)} at 95 %."
        if refused:
            text += f" Refused: {', '.join(refused)}."
        warn_user(
            text + " estimates='allow' silences this, 'refuse' forbids them.", EstimateWarning
        )

    # ------------------------------------------------ composition
    @property
    def components(self) -> tuple[str, ...]:
        """Record keys of the components, in the order given."""
        return self._composition.keys

    @property
    def mass_fractions(self) -> dict[str, Any]:
        """Mass fraction of each component; floats or arrays."""
        return dict(zip(self._composition.keys, self._composition.fractions, strict=True))

    def fractions(self, by: str = "mass", *, measured_at: Any = 293.15) -> dict[str, Any]:
        """Fraction of each component on a basis.

        Parameters
        ----------
        by : {"mass", "mole", "volume"}
            ``"volume"`` means volumes before mixing at `measured_at`.
        measured_at : temperature
            Of those volumes [K, or with a unit].

        Returns
        -------
        dict of str to float or array
            Fractions [-] by component, in the order given.

        Raises
        ------
        CompositionError
            No such basis, or the volume of a solid.

        Examples
        --------
        >>> import dropkit as dk
        >>> ink = dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass")
        >>> round(ink.fractions("mole")["glycerol"], 4)
        0.1071
        """
        check_basis(by)
        keys = self._composition.keys
        kelvin = units.single(measured_at, "temperature", "measured_at", plausible=True)
        shares = from_mass(keys, self._composition.fractions, by, kelvin)
        return dict(zip(keys, shares, strict=True))

    @property
    def molar_mass(self) -> Any:
        """Mean molar mass [kg/mol], salts counted as one unit."""
        moles = sum(
            w / records.liquid_record(key).molar_mass
            for key, w in zip(self._composition.keys, self._composition.fractions, strict=True)
        )
        return 1.0 / moles

    @property
    def cautions(self) -> tuple[str, ...]:
        """Flash points and hazards of the components, and what they don't say of the mixture."""
        if self._pure is not None:
            return self._pure.cautions
        return tuple(mixture_cautions(self._keys))

    @property
    def assumptions(self) -> tuple[str, ...]:
        """What was taken for granted in reading the composition."""
        return self._composition.assumptions

    # ------------------------------------------------ what Fluid asks for
    def _blend(self, prop: str) -> Blend | MissingProperty:
        if prop not in self._blends:
            try:
                found: Blend | MissingProperty = blend(prop, self._keys)
                assert isinstance(found, Blend)
                found.range(self._mass)
            except MissingProperty as problem:
                found = problem
            if isinstance(found, Blend) and found.estimated and self._estimates == "refuse":
                pairs = ", ".join(
                    f"{found.records[i].name} + {found.records[j].name}" for i, j in found.unfitted
                )
                found = EstimateRefused(
                    f"The {prop} of {self.name} could only be estimated: no measured record of "
                    f"{pairs or 'the salt in this solvent'}",
                    hint="estimates='allow' gives the estimate with its error",
                )
            self._blends[prop] = found
        return self._blends[prop]

    def _need(self, prop: str) -> Blend:
        found = self._blend(prop)
        if isinstance(found, MissingProperty):
            raise found
        return found

    def _missing(self, prop: str) -> MissingProperty:
        if self._pure is not None:
            return self._pure._missing(prop)
        if prop == "kinematic_viscosity":
            prop = (
                "viscosity" if isinstance(self._blend("viscosity"), MissingProperty) else "density"
            )
        found = self._blend(prop)
        return found if isinstance(found, MissingProperty) else super()._missing(prop)

    def available(self) -> tuple[str, ...]:
        """Names of the properties that can be given for this mixture.

        Returns
        -------
        tuple of str
            In the order of tables.
        """
        if self._pure is not None:
            return self._pure.available()
        held = {prop for prop in RULES if isinstance(self._blend(prop), Blend)}
        if {"density", "viscosity"} <= held:
            held.add("kinematic_viscosity")
        return tuple(prop for prop in PROPERTIES if prop in held)

    def _record_blocks(self, prop: str) -> Sequence[records.PropertyRecord]:
        if self._pure is not None:
            return self._pure._record_blocks(prop)
        return self._need(prop).serving(self._mass, None)

    def _record_range(self, prop: str) -> Range:
        if self._pure is not None:
            return self._pure._record_range(prop)
        return self._need(prop).range(self._mass)

    def _shape(self) -> tuple[int, ...]:
        return self._composition.shape

    def _broadcast(self, shape: tuple[int, ...]) -> Fluid:
        if self._shape() == ():
            return self
        flat = tuple(np.broadcast_to(w, shape).reshape(-1) for w in self._mass)
        return Mixture(Composition(self._keys, flat), estimates=self._estimates, quiet=True)

    def _record_scalar(self, prop: str) -> Callable[[float], float] | None:
        if self._shape() != ():
            return None
        if self._pure is not None:
            return self._pure._record_scalar(prop)
        return self._need(prop).scalar(self._mass)

    def _record_fill(
        self, prop: str, part: slice, temperature: FloatArray, out: FloatArray
    ) -> None:
        if self._pure is not None:
            self._pure._record_fill(prop, part, temperature, out)
            return
        mass = [w[part] if np.ndim(w) else w for w in self._mass]
        self._need(prop).fill(mass, temperature, out)

    def _without_gaps(self, prop: str) -> bool:
        if self._pure is not None:
            return True
        parts = QUOTIENT if self._is_quotient(prop) else (prop,)
        return all(self._need(part).without_gaps(self._mass) for part in parts)

    def _composition_is_settled(self) -> bool:
        return self._pure is not None and self._shape() == ()

    def _record_settle(self, prop: str, temperature: Any, outside: str) -> Any:
        if self._pure is not None:
            return False
        rule = self._need(prop)
        subject = f"{prop} of {self.name}"
        mask: Any = False
        for share, limits in rule.composition_limits(self._mass):
            mask = mask | settle(subject, share, limits, outside)
        unserved = rule.unserved(self._mass, temperature)
        if unserved is False or outside == "allow":
            return mask
        # Points beyond the outer range of temperature were told before.
        limits = rule.range(self._mass)
        unserved = unserved & ~np.asarray(mask) & limits.holds(np.asarray(temperature, float))
        if not np.any(unserved):
            return mask
        if outside == "nan":
            return mask | unserved
        kelvin = np.broadcast_to(temperature, np.shape(unserved))[unserved]
        what = (
            f"{subject}: no record holds {int(np.sum(unserved))} of {np.size(unserved)} points "
            f"of temperature and composition, the first at {kelvin.flat[0]:g} K"
        )
        if outside == "raise":
            raise OutOfRange(
                what,
                allowed="; ".join(
                    f"{block.range} at mass fractions {low:g} to {high:g} of {rule_first}"
                    for rule_first, block, low, high in rule.cells()
                ),
                hint="outside='warn', 'nan' or 'allow' changes what happens",
            )
        warn_user(what, RangeWarning)
        return mask

    def _record_trail(self, prop: str, temperature: float | FloatArray | None) -> Trail:
        if self._pure is not None:
            return self._pure._record_trail(prop, temperature)
        rule = self._need(prop)
        used = rule.serving(self._mass, temperature)
        grades = [block.grade for block in used]
        if rule.estimated:
            grades.append("estimated")
        cautions = [text for block in used for text in block.cautions]
        if prop == "viscosity":
            cautions.append("viscosity at low shear")
        cautions += mixture_phases(self._keys, temperature)
        return Trail(
            quantity=prop,
            subject=self.name,
            method=rule.method,
            grade=worst_grade(grades),
            uncertainty=self._spread(rule, prop, temperature),
            records=tuple(record_use(block) for block in used),
            assumptions=tuple(dict.fromkeys((*self.assumptions, *taken_for_granted(rule)))),
            cautions=tuple(dict.fromkeys(cautions)),
            versions=versions(used),
        )

    def _spread(
        self, rule: Blend, prop: str, temperature: float | FloatArray | None
    ) -> float | None:
        """Relative standard uncertainty: of the pairs, the pure ends by their share, estimates."""
        value = None
        if temperature is not None:
            found = np.asarray(self._evaluate(prop, temperature, "nan"))
            value = float(np.nanmin(found)) if np.isfinite(found).any() else None
        if 0 in self._shape() or (temperature is not None and value is None):
            return None
        used = rule.serving(self._mass, temperature)
        known = {id(block): relative_uncertainty(block, value) for block in used}
        with np.errstate(all="ignore"):  # a point of salt alone has no share of solvents
            shares = [float(np.nanmax(x)) for x in rule.fractions(self._mass)]
            extra = rule.estimate_error(self._mass, temperature)
        ends = 0.0
        for share, curve in zip(shares, rule.curves, strict=True):
            ends += share * max(known.pop(id(block), 0.0) for block in curve.records)
        return float(np.hypot(max(ends, *known.values(), 0.0), extra))

    # ------------------------------------------------ display
    def __repr__(self) -> str:
        return display.fluid_text(self, f"Mixture {self.name}")

    def _repr_html_(self) -> str:
        return display.fluid_html(self, f"Mixture {self.name}")


def _rebuild(composition: Composition, estimates: Literal["warn", "allow", "refuse"]) -> Mixture:
    return Mixture(awoken(composition), estimates=estimates, quiet=True)
