"""One property block of a spec into one block of a record."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass, field
from typing import Any

import numpy as np

from dropkit.properties.equations import FORMS
from dropkit.record_types import INTERFACIAL, LEADING
from record_builder import BuildError, Refused
from record_builder.checking import chosen_checks, given_checks, verify
from record_builder.fitting import excess
from record_builder.forms import Parameters, parameter_names
from record_builder.formulations import SAMPLE, sample
from record_builder.limits import allowed
from record_builder.points import Point, Published, within
from record_builder.solutes import SOLUTE_FORMS
from record_builder.statistics import (
    Deviation,
    absolute,
    by_source,
    quantile,
    relative,
    round_up,
    summary,
)
from record_builder.subjects import Pair, Subject, arrays, columns_of

__all__ = ["Built", "build_block"]

_KEYS = {
    *("form", "fit", "second", "left_out", "published", "formulation", "sample", "range"),
    *("mixture_range", "mixture_range_reason", "extrapolated", "fraction_range", "sources"),
    *("place", "source_uncertainty", "source_uncertainty_absolute", "absolute", "single"),
    *("source_uncertainty_reason", "single_reason", "grade", "limit_class", "cautions", "points"),
    *("viscosity_change_by_water", "viscosity_change_by_water_reason", "checks", "degree"),
    *("rows", "columns", "robust", "balance", "ridge", "exponent", "note"),
    *("transform", "basis", "centre", "scale"),
}
# Kept in the record, so that a reader sees why.
_REMARKS = ("mixture_range_reason", "source_uncertainty_reason", "single_reason", "note")
_GRADES = ("reference", "measured", "single", "recalled", "estimated")
# Grades that rest on no second source and are not refused for want of one.
_UNCHECKED = ("recalled", "estimated")
_SLACK = 2.0  # K that a range may reach beyond its data
_OVERSHOOT = 2.0  # largest excess between the points over the largest at them


@dataclass
class Built:
    """A finished block, every point with its part, and the statistics."""

    record: dict[str, Any]
    deviations: list[Deviation] = field(default_factory=list)
    report: dict[str, Any] = field(default_factory=dict)


@dataclass
class _Block:
    """The working state of one block."""

    subject: Subject
    prop: str
    spec: Mapping[str, Any]
    published: Published

    def __post_init__(self) -> None:
        self.what = f"{self.subject.name}: {self.prop}"
        self.pair = isinstance(self.subject, Pair)
        self.form = str(self.spec.get("form", "redlich_kister" if self.pair else ""))
        solute = self.form in SOLUTE_FORMS or self.form == "redlich_kister"
        if not solute and self.form not in FORMS:
            raise BuildError(f"{self.what}: form {self.form!r}; known: {', '.join(FORMS)}")
        known = _KEYS | (set() if solute else parameter_names(self.form))
        unknown = sorted(set(self.spec) - known)
        if unknown:
            raise BuildError(f"{self.what}: unknown keys {', '.join(unknown)}")
        for needed in ("range", "place"):
            if needed not in self.spec:
                raise BuildError(f"{self.what}: {needed} is missing")
        ways = [way for way in ("fit", "published", "sample") if way in self.spec]
        if not ways or ("published" in ways and len(ways) > 1):
            raise BuildError(f"{self.what}: give fit, published or sample, not {ways}")
        if ("sample" in ways) > ("formulation" in self.spec):
            raise BuildError(f"{self.what}: a sample needs its formulation in words")
        self.range = [float(value) for value in self.spec["range"]]
        self.fractions = [float(value) for value in self.spec.get("fraction_range", [0.0, 1.0])]

    def select(self, role: str) -> list[Point]:
        return self.published.select(
            self.spec.get(role, []), self.prop, self.subject.names, self.subject.molar_masses
        )

    def deviations(
        self, parameters: Mapping[str, Any], points: Sequence[Point], role: str
    ) -> list[Deviation]:
        if not points:
            return []
        T, w, _, _ = arrays(points)
        fitted = self.subject.values(self.prop, self.form, parameters, T, w)
        usable = self.subject.usable(self.prop, points)
        found = []
        for point, value, good in zip(points, fitted, usable, strict=True):
            part = role
            if point.excluded:
                part = "excluded"
            elif not good:
                part = "end"
            elif not within(point, self.range, self.fractions):
                part = "outside"
            found.append(Deviation(point, float(value), part))
        return found

    def usable(self, points: Sequence[Point]) -> list[Point]:
        flags = self.subject.usable(self.prop, points) if points else []
        return [p for p, good in zip(points, flags, strict=True) if good and not p.excluded]

    def cover(self, points: Sequence[Point]) -> None:
        """Refuse a range that runs beyond the temperatures of its data."""
        low = min(p.temperature for p in points)
        high = max(p.temperature for p in points)
        beyond = self.range[0] < low - _SLACK or self.range[1] > high + _SLACK
        if beyond and not self.spec.get("extrapolated"):
            raise Refused(
                f"{self.what}: range {self.range[0]:g} to {self.range[1]:g} K, but the points "
                f"run from {low:g} to {high:g} K"
            )

    def smooth(self, parameters: Mapping[str, Any], points: Sequence[Point]) -> float:
        """Largest excess anywhere over the largest at the points; refuses a wild fit."""
        assert isinstance(self.subject, Pair)
        T, w, _, _ = arrays(points)
        basis, rows = parameters["basis"], parameters["coefficients"]
        at_points = np.abs(excess(self.subject.composition(w, basis), T, rows)).max()
        all_w = np.linspace(self.fractions[0], self.fractions[1], 101)
        all_T = np.linspace(self.range[0], self.range[1], 21)
        grid_w, grid_T = (grid.ravel() for grid in np.meshgrid(all_w, all_T))
        anywhere = np.abs(excess(self.subject.composition(grid_w, basis), grid_T, rows)).max()
        ratio = float(anywhere / at_points)
        if ratio > _OVERSHOOT:
            raise Refused(
                f"{self.what}: between the points the excess grows to {ratio:.1f} times its "
                "largest value at them; fewer rows or columns, or a narrower range"
            )
        return ratio

    def left_out(self, points: Sequence[Point]) -> tuple[str, list[Deviation]]:
        """Deviations of points that a refit did not see, and how they were left out."""
        sources = sorted({p.source for p in points})
        how = self.spec.get("left_out") or ("source" if len(sources) > 1 else "every fifth")
        if how == "source":
            if len(sources) < 2:
                raise BuildError(f"{self.what}: left_out = 'source' needs two sources")
            groups = [[p for p in points if p.source == source] for source in sources]
            words = "each source in turn"
        elif how == "every fifth":
            order = sorted(points, key=lambda p: (p.temperature, p.fraction, p.value))
            count = min(5, len(order))
            groups = [order[start::count] for start in range(count)]
            words = "every fifth point" if count == 5 else "each point in turn"
        else:
            raise BuildError(f"{self.what}: left_out = {how!r}; allowed: source, every fifth")
        found: list[Deviation] = []
        for group in groups:
            seen = [p for p in points if p not in group]
            try:
                parameters = self.subject.fit(self.prop, self.spec, seen)
            except Refused:
                continue  # that group carries the fit; the others still tell
            low = min(p.temperature for p in seen) - _SLACK
            high = max(p.temperature for p in seen) + _SLACK
            fair = [p for p in group if low <= p.temperature <= high]
            found += [
                d for d in self.deviations(parameters, fair, "left-out") if d.role == "left-out"
            ]
        return words, found


def _obtained(spec: Mapping[str, Any], points: Sequence[Point]) -> str:
    sampled = sum(p.file == SAMPLE for p in points)
    parts = []
    if sampled:
        parts.append(f"{sampled} values of {spec['formulation']}")
    if len(points) > sampled:
        parts.append(f"{len(points) - sampled} points")
    robust = ", robust" if spec.get("robust") else ""
    return f"fitted here to {' and '.join(parts)}{robust}"


@dataclass(frozen=True)
class _Spread:
    """What the sources state and what also covers the independent points (k = 1)."""

    stated: float
    covering: float
    covering_si: float


def _spread(
    block: _Block, groups: Sequence[Sequence[Deviation]], points: Sequence[Point]
) -> _Spread:
    spec = block.spec
    typical = float(np.median([p.value for p in points])) if points else 1.0
    if "source_uncertainty" in spec:
        stated = float(spec["source_uncertainty"])
        in_si = float(spec.get("source_uncertainty_absolute", stated * typical))
    elif "source_uncertainty_absolute" in spec and points:
        in_si = float(spec["source_uncertainty_absolute"])
        stated = in_si / typical
    else:
        raise BuildError(f"{block.what}: source_uncertainty is missing")
    if spec.get("grade") in _UNCHECKED:
        stated = max(stated, 0.05)
    filled = [group for group in groups if group]
    halves = [0.5 * quantile(relative(group), 0.95) for group in filled]
    halves_si = [0.5 * quantile(absolute(group), 0.95) for group in filled]
    return _Spread(stated, round_up(max([stated, *halves])), round_up(max([in_si, *halves_si])))


def _judge(block: _Block, parameters: Mapping[str, Any], second: Sequence[Deviation]) -> str:
    """An empty text if the second source agrees, else the refusal."""
    T, w, _, _ = arrays([d.point for d in second])
    limits, words = allowed(block.subject, block.prop, block.spec, block.form, parameters, T, w)
    sizes = np.abs(relative(second))
    if np.median(sizes / limits) <= 1.0:
        return ""
    keys = ", ".join(sorted({d.point.source for d in second}))
    return (
        f"{block.what}: second source {keys} disagrees by {100 * np.median(sizes):.3g} % "
        f"(median of {len(second)} points inside the range); limit {100 * np.median(limits):.3g} % "
        f"({words})"
    )


def _same_measurement(block: _Block, fitted: Sequence[Point], second: Sequence[Point]) -> None:
    """A copy, or an equation fitted to the other's data, is no second source."""
    origins = {
        key: block.published.origins(key)
        for key in {p.key for p in (*fitted, *second)} | set(block.spec.get("sources", []))
    }
    mine = {p.key for p in fitted} | set(block.spec.get("sources", []))
    for theirs in {p.key for p in second} - mine:
        for key in mine:
            common = origins[theirs] & origins[key]
            if common:
                raise BuildError(
                    f"{block.what}: {theirs} is no second source beside {key}: "
                    f"both rest on {', '.join(sorted(common))}"
                )


def _grade(spec: Mapping[str, Any], what: str, agrees: bool) -> str:
    single = bool(spec.get("single"))
    if single and not spec.get("single_reason"):
        raise BuildError(f"{what}: single = true needs single_reason")
    grade = "measured" if agrees and not single else "single"
    wanted = spec.get("grade", grade)
    if wanted not in _GRADES:
        raise BuildError(f"{what}: grade {wanted!r}; allowed: {', '.join(_GRADES)}")
    if _GRADES.index(wanted) < _GRADES.index(grade):
        standard = "formulation" in spec or "published" in spec
        if wanted != "reference" or not agrees or not standard:
            raise Refused(f"{what}: grade {wanted} is not borne out; it would be {grade}")
    return str(wanted)


def build_block(
    subject: Subject, prop: str, spec: Mapping[str, Any], published: Published
) -> Built:
    """Fit, compare, refuse or grade one property block.

    Raises
    ------
    Refused
        If a second source disagrees or the data do not bear the fit.
    BuildError
        If the spec is wrong.
    """
    block = _Block(subject, prop, spec, published)
    what = block.what
    chosen = block.select("fit")
    if "sample" in spec:
        chosen = sample(prop, spec["sample"]) + chosen
    second_points = block.select("second")
    fit_sources = {p.source for p in chosen}
    shared = fit_sources & {p.source for p in second_points}
    if shared:
        raise BuildError(
            f"{what}: {', '.join(sorted(shared))} is fitted, so it is no second source"
        )
    _same_measurement(block, chosen, second_points)
    points = block.usable(chosen)

    parameters: Parameters
    report: dict[str, Any] = {"form": block.form}
    how = ""
    left: list[Deviation] = []
    if "published" in spec:
        parameters = dict(spec["published"])
        points = []
    else:
        if not points:
            raise Refused(f"{what}: no usable point")
        block.cover(points)
        parameters = _rounded(subject.fit(prop, spec, points))
        if block.form == "redlich_kister":
            report["columns"] = columns_of(spec)
            report["excess_between_points"] = round_up(block.smooth(parameters, points))
        how, left = block.left_out(points)

    fitted = block.deviations(parameters, chosen, "fit")
    second = block.deviations(parameters, second_points, "second")
    everything = [*fitted, *second, *left]
    inside = [d for d in second if d.role == "second"]
    judged = inside
    if not second_points and len({p.source for p in points if p.file != SAMPLE}) > 1:
        judged = left if how == "each source in turn" else []
    refusal = (
        _judge(block, parameters, judged)
        if judged
        else f"{what}: no independent second source inside the range"
    )
    if refusal and not spec.get("single") and spec.get("grade") not in _UNCHECKED:
        raise Refused(refusal)

    grade = _grade(spec, what, not refusal)
    # Left-out samples of a formulation tell about the form, not about the liquid.
    told = [] if "sample" in spec and not spec.get("fit") else left
    spread = _spread(block, [inside, told], [d.point for d in (*fitted, *second)])
    if grade == "reference":
        # A standard states its own uncertainty; the scatter of single papers is not it. What
        # the fit adds to the standard is.
        worst = [0.5 * float(np.abs(relative(left)).max())] if left else []
        uncertainty = round_up(max([spread.stated, *worst]))
    else:
        uncertainty = spread.covering

    keys = list(dict.fromkeys(p.key for p in points if p.file != SAMPLE))
    if "formulation" in spec and "sources" not in spec:
        raise BuildError(f"{what}: a formulation needs sources")
    sources = list(spec.get("sources", keys))
    if not sources:
        raise BuildError(f"{what}: sources is missing")

    record: dict[str, Any] = {"form": block.form, **parameters, "range": block.range}
    if "mixture_range" in spec:
        if "mixture_range_reason" not in spec:
            raise BuildError(f"{what}: mixture_range needs mixture_range_reason")
        record["mixture_range"] = [float(value) for value in spec["mixture_range"]]
    if block.pair:
        record["fraction_range"] = block.fractions
    record["uncertainty"] = uncertainty
    if spec.get("absolute"):
        record["uncertainty_absolute"] = spread.covering_si
    record |= {"grade": grade, "sources": sources, "place": spec["place"]}
    if "published" not in spec:  # else as published, which is what a record says by silence
        record["obtained"] = _obtained(spec, points)
    if judged:
        record["second"] = _second(judged)
    if left:
        numbers = summary(relative(left))
        record["left_out"] = {name: numbers[name] for name in ("median", "p95")}
        if how != "every fifth point":  # which is what a record says by silence
            record["left_out"] = {"how": how} | record["left_out"]
    files = [p.file for p in (*chosen, *second_points) if p.file != SAMPLE]
    shown = list(spec.get("points", dict.fromkeys(files)))
    record["checks"] = given_checks(spec.get("checks", []), record, what) or chosen_checks(
        inside or [d for d in fitted if d.role == "fit"],
        record,
        shown,
        3 if prop in LEADING or block.pair else 1,
    )
    verify(block.subject, prop, record)
    record["cautions"] = list(spec.get("cautions", []))
    if "extrapolated" in spec:
        record["range_reason"] = spec["extrapolated"]
    record |= {key: spec[key] for key in _REMARKS if key in spec}
    record["points"] = [name.removeprefix(f"{_folder(block)}/") for name in shown]

    report |= {
        "grade": grade,
        "uncertainty": uncertainty,
        "coefficients": _count(parameters),
        "disagreement": refusal,
        "note": " ".join(
            str(spec[k]) for k in ("single_reason", "extrapolated", "note") if k in spec
        ),
    }
    for role in ("fit", "second", "left-out"):
        mine = [d for d in everything if d.role == role]
        if mine:
            report[role.replace("-", "_")] = summary(relative(mine)) | {"by": by_source(mine)}
    return Built(record, everything, report)


def _folder(block: _Block) -> str:
    """The folder of `data` and of `data/published` that a record and its points belong to."""
    if block.pair:
        return "mixtures"
    return "interfaces" if block.prop == INTERFACIAL else "liquids"


def _second(judged: Sequence[Deviation]) -> dict[str, Any]:
    keys: dict[str, int] = {}
    for deviation in judged:
        keys[deviation.point.key] = keys.get(deviation.point.key, 0) + 1
    order = sorted(keys, key=lambda key: -keys[key])
    numbers = summary(relative(judged))
    found: dict[str, Any] = {"source": order[0]}
    if len(order) > 1:
        found["sources"] = order[1:]
    return {name: numbers[name] for name in ("points", "median", "worst")} | found


def _rounded(value: Any) -> Any:
    """Ten figures: far beyond any data, and short enough to read."""
    if isinstance(value, float):
        return float(f"{value:.10g}")
    if isinstance(value, list):
        return [_rounded(entry) for entry in value]
    if isinstance(value, dict):
        return {key: _rounded(entry) for key, entry in value.items()}
    return value


def _count(parameters: Mapping[str, Any]) -> int:
    total = 0
    for name in ("coefficients", "numerator", "denominator"):
        for entry in parameters.get(name, []):
            total += len(entry) if isinstance(entry, list) else 1
    return total
