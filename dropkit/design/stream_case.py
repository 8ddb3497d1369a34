"""One call of the stream's array core: facts in, quantities, criteria and refusals out."""

from __future__ import annotations

import math
from collections.abc import Mapping
from dataclasses import dataclass, field, replace
from typing import Any, Final

import numpy as np

from dropkit.design.stream_criteria import CUT_OFF, Criterion, Limits, criteria
from dropkit.design.stream_given import AGREE
from dropkit.design.stream_hole import Hole
from dropkit.design.stream_quantities import Drive, quantities
from dropkit.design.stream_solver import Liquid, Solved, choose, solve

__all__ = ["Case", "Refusal"]

# How far a further fact may lie from what the models of the hole give before it contradicts.
_TOLERANCES: Final = {"gauge_pressure": 0.2, "nozzle_diameter": 0.15, "jet_diameter": 0.15}
_LENGTHS: Final = ("drop_diameter", "jet_diameter", "nozzle_diameter")


@dataclass(frozen=True, slots=True)
class Refusal:
    """Why some designs are refused.

    Parameters
    ----------
    where : ndarray of bool
        Which ones.
    text : str
        What is wrong, the same for all.
    detail : str
        Of the first one: the numbers and the nearest possible thing.
    contradiction : bool
        Whether the inputs contradict each other, rather than ask for what no jet does.
    """

    where: Any
    text: str
    detail: str = ""
    contradiction: bool = False


@dataclass(frozen=True, slots=True)
class Case:
    """Everything that the core needs, for n designs; floats or arrays of n [SI].

    Parameters
    ----------
    liquid : Liquid
        Density, viscosity, surface tension.
    facts : mapping
        Word of the solver to value.
    hole : Hole
        Kind and length of the hole.
    holes : float or array
        Their number.
    limits : Limits
        Of the user, and the surroundings.
    drive : Drive
        Amplitude of the drive.
    n : int
        Number of designs.
    words : mapping
        Fact to the input that the user gave for it, for messages.
    """

    liquid: Liquid
    facts: Mapping[str, Any]
    hole: Hole
    holes: Any
    limits: Limits
    drive: Drive
    n: int
    words: Mapping[str, str] = field(default_factory=dict)

    def solve(self) -> Solved:
        """The unknowns."""
        return solve(self.liquid, self.facts, self.hole, self.n)

    def quantities(self, solved: Solved) -> dict[str, Any]:
        """All quantities; what was given stands as it was given."""
        found = quantities(
            self.liquid, solved, self.hole, self.holes, self.limits.gas_density, self.drive
        )
        for word, value in self.facts.items():
            if word in solved.used or np.isnan(found[word]).all():
                found[word] = np.broadcast_to(value, (self.n,))
        if "drop_volume" in self.facts and np.isnan(found["drop_diameter"]).all():
            found["drop_diameter"] = np.cbrt(6.0 / math.pi * found["drop_volume"])
            found["drop_mass"] = self.liquid.density * found["drop_volume"]
        if "flow" in self.facts and np.isnan(found["total_flow"]).all():
            found["total_flow"] = self.holes * found["flow"]
            found["mass_flow"] = self.liquid.density * found["total_flow"]
        whole = {word: np.broadcast_to(value, (self.n,)) for word, value in found.items()}
        return {word: np.where(np.isfinite(v), v, np.nan) for word, v in whole.items()}

    def criteria(self, found: dict[str, Any]) -> tuple[Criterion, ...]:
        """The judgement."""
        return criteria(found, self.liquid, self.hole, self.limits)

    def with_facts(self, **changes: Any) -> Case:
        """The same with other facts; None drops one."""
        facts = {**self.facts, **changes}
        kept = {word: value for word, value in facts.items() if value is not None}
        return replace(self, facts=kept)

    def _named(self, fact: str) -> str:
        """A fact in the user's own word."""
        if fact == "most_unstable":
            return "the most unstable wavelength"
        return self.words.get(fact, fact)

    # ------------------------------------------------ refusals
    def refusals(
        self, solved: Solved, found: dict[str, Any], checks: tuple[tuple[str, str, Any], ...] = ()
    ) -> list[Refusal]:
        """Why designs are impossible or contradictory, the gravest first."""
        listed = [
            *self._contradictions(solved, found, checks),
            self._no_root(solved, found),
            self._cut_off(found),
            self._boiling(),
        ]
        return [each for each in listed if each is not None and np.any(each.where)]

    def _known(self) -> Any:
        """Where every fact is a number: NaN in gives NaN out without a reason."""
        known = np.full(self.n, True)
        parts = (*self.facts.values(), self.liquid.density, self.liquid.viscosity,
                 self.liquid.surface_tension)  # fmt: skip
        for part in parts:
            known &= ~np.isnan(part)
        return known

    def _contradictions(
        self, solved: Solved, found: dict[str, Any], checks: tuple[tuple[str, str, Any], ...]
    ) -> list[Refusal]:
        listed: list[Refusal] = []
        further = [(word, word, value) for word, value in self.facts.items()
                   if word not in solved.used]  # fmt: skip
        if not further and not checks:
            return listed
        solution = quantities(
            self.liquid, solved, self.hole, self.holes, self.limits.gas_density, Drive()
        )
        for given, fact, value in (*further, *checks):
            word = self._named(given) if given == fact else given
            if given != fact:
                implied = found[fact]
            elif fact == "nozzle_diameter":
                if "jet_diameter" in self.facts:  # their ratio is the contraction
                    continue
                implied = self._hole_behind(solved)
            else:
                implied = solution[fact]
            with np.errstate(all="ignore"):
                ratio = np.asarray(value / implied) * np.ones(self.n)
                where = np.abs(ratio - 1.0) > _TOLERANCES.get(fact, AGREE)
            if not np.any(where):
                continue
            i = int(np.argmax(where))
            others = ", ".join(self._named(each) for each in solved.used if each != fact) or fact
            detail = f"{word} is {ratio[i]:.4g} times what {others} give{'s' * (',' not in others)}"
            listed.append(
                Refusal(
                    where,
                    f"contradictory: {word} against {others}",
                    f"{detail}{self._slip(i, word, fact, value, implied, given != fact)}",
                    contradiction=True,
                )
            )
        return listed

    def _hole_behind(self, solved: Solved) -> Any:
        """The hole that the models want behind the jet that the other facts give."""
        d = np.exp(solved.size)
        flow = 0.25 * math.pi * d * d * np.exp(solved.speed)
        return self.hole.diameter_of(self.liquid.density, self.liquid.viscosity, flow, d)

    def _slip(self, i: int, word: str, fact: str, value: Any, implied: Any, twin: bool) -> str:
        """The likely slip behind a contradiction, found by trying it."""
        facts = {w: np.atleast_1d(np.broadcast_to(v, (self.n,))[i]) for w, v in self.facts.items()}
        target = np.broadcast_to(value, (self.n,))[i]
        one = replace(self, liquid=self._liquid_of(i), facts=facts, hole=self._hole_of(i), n=1)
        tries: list[tuple[str, str, Any]] = []
        for each in ("drop_volume", "jet_diameter", "nozzle_diameter"):
            if each in facts:
                power = 3.0 if each == "drop_volume" else 1.0
                name = "the drop" if each == "drop_volume" else f"the {each.split('_')[0]}"
                tries.append((each, f"a radius of {name} given for its diameter", 2.0**power))
                tries.append((each, f"a diameter of {name} doubled", 0.5**power))
        for each, text, factor in tries:
            changed = {**facts, each: facts[each] * factor}
            wanted = target * factor if each == fact and twin else target
            if each == fact and not twin:
                if abs(target * factor / np.broadcast_to(implied, (self.n,))[i] - 1.0) < 0.05:
                    return f"; {text}?"
                continue
            trial = replace(one, facts=changed)
            solution = trial.quantities(trial.solve())
            if abs(wanted / solution[fact][0] - 1.0) < 0.02:
                return f"; {text}?"
        if fact == "gauge_pressure":
            gauge = target - float(np.max(self.limits.ambient_pressure))
            if abs(gauge / np.broadcast_to(implied, (self.n,))[i] - 1.0) < 0.1:
                return "; an absolute pressure given for the gauge pressure?"
        ratio = target / np.broadcast_to(implied, (self.n,))[i]
        count = float(np.max(self.holes))
        if (
            fact == "flow"
            and count > 1
            and min(abs(ratio * count - 1), abs(ratio / count - 1)) < 0.02
        ):
            return "; the flow of one hole and that of all taken for each other?"
        whole = round(ratio)
        of_all = word in ("total_flow", "mass_flow", "drop_rate") and count == 1
        if of_all and whole > 1 and abs(ratio / whole - 1.0) < 0.02:
            return f"; {whole} holes? Then say holes={whole}"
        if fact == "frequency" and min(abs(ratio / 6.2832 - 1), abs(ratio * 6.2832 - 1)) < 0.01:
            return "; an angular frequency given for the frequency?"
        return ""

    def _liquid_of(self, i: int) -> Liquid:
        parts = (self.liquid.density, self.liquid.viscosity, self.liquid.surface_tension)
        return Liquid(*(np.broadcast_to(part, (self.n,))[i] for part in parts))

    def _hole_of(self, i: int) -> Hole:
        words = ("length", "length_ratio", "contraction", "entry_loss", "discharge_coefficient")
        picked: dict[str, Any] = {}
        for word in words:
            value = getattr(self.hole, word)
            picked[word] = value if value is None else np.broadcast_to(value, (self.n,))[i]
        return replace(self.hole, **picked)

    def _no_root(self, solved: Solved, found: dict[str, Any]) -> Refusal | None:
        """Facts that were enough, and yet no jet does it."""
        if len(solved.used) < 3:
            return None
        sizes = found["velocity"] + found["jet_diameter"] + found["frequency"] + found["flow"]
        lost = np.isnan(sizes) & self._known()
        if not lost.any():
            return None
        i = int(np.argmax(lost))
        words = ", ".join(self._named(word) for word in solved.used)
        detail = f"no jet has the given {words}"
        if {"gauge_pressure", "nozzle_diameter"} <= set(solved.used):
            tension = np.broadcast_to(self.liquid.surface_tension, (self.n,))[i]
            bore = np.broadcast_to(self.facts["nozzle_diameter"], (self.n,))[i]
            detail += f"; surface tension alone holds back about {4.0 * tension / bore:.4g} Pa"
        for word in ("gauge_pressure", "nozzle_diameter"):
            rest = frozenset(self.facts) - {word}
            if word in solved.used and len(choose(rest)) == 3:
                trial = replace(
                    self.with_facts(**{word: None}), liquid=self._liquid_of(i),
                    hole=self._hole_of(i), n=1,
                )  # fmt: skip
                facts = {w: np.broadcast_to(v, (self.n,))[i] for w, v in trial.facts.items()}
                trial = replace(trial, facts=facts)
                wanted = trial.quantities(trial.solve())[word][0]
                if np.isfinite(wanted):
                    detail += f"; at the most unstable wavelength the rest asks for {word} "
                    detail += f"{wanted:.4g} {'Pa' if word == 'gauge_pressure' else 'm'}"
                    break
        return Refusal(lost, f"no jet has this {words}", detail)

    def _cut_off(self, found: dict[str, Any]) -> Refusal | None:
        with np.errstate(all="ignore"):
            where = found["wavelength_ratio"] < CUT_OFF * (1.0 - 1e-9)
        if not where.any():
            return None
        i = int(np.argmax(where))
        ratio, drop = found["wavelength_ratio"][i], found["drop_ratio"][i]
        d, speed = found["jet_diameter"][i], found["velocity"][i]
        text = (
            f"the wave is {ratio:.3g} jet diameters long, the drop {drop:.3g}; nothing shorter "
            f"than {CUT_OFF:.3f} grows, so that drops are at least 1.68 jet diameters (below "
            "1.74 doubtful)"
        )
        if np.isfinite(d):
            text += f"; the nearest: drops of {1.6766 * d * 1e6:.4g} um"
            if np.isfinite(speed):
                text += f", or a frequency of {speed / (CUT_OFF * d) / 1e3:.4g} kHz"
            volume = found["drop_volume"][i]
            text += f"; for this drop, a jet of {found['drop_diameter'][i] / 1.6766 * 1e6:.4g} um"
            if not np.isfinite(volume):
                text = text.rsplit(";", 1)[0]
        return Refusal(where, "beyond cut-off: drop below 1.68 jet diameters", text)

    def _boiling(self) -> Refusal | None:
        vapour = self.limits.vapour_pressure
        if vapour is None:
            return None
        where = np.broadcast_to(vapour > self.limits.ambient_pressure, (self.n,))
        text = (
            "the liquid is above its boiling point at the ambient pressure and flashes as it "
            "leaves: no theory of jets holds"
        )
        return Refusal(where, "flashes at the outlet", text)
