"""How a fluid is evaluated: what each kind must say of itself, and the range policy on top."""

from __future__ import annotations

from abc import abstractmethod
from collections.abc import Callable, Sequence
from dataclasses import replace
from typing import Any

import numpy as np

from dropkit import units
from dropkit.errors import BadInput, DropkitWarning, MissingProperty, RecalledWarning, warn_user
from dropkit.properties.curves import CHUNK, Fast, FloatArray
from dropkit.properties.property_methods import PropertyMethods
from dropkit.properties.property_words import KELVIN_HINT, QUOTIENT
from dropkit.properties.trails import quotient_trail
from dropkit.provenance import Trail
from dropkit.records import PropertyRecord
from dropkit.validity import Outside, Range, check_outside, settle

__all__ = ["Evaluation"]


class Evaluation(PropertyMethods):
    """What a kind of fluid must say of its properties, and their evaluation from it."""

    name: str

    def __init__(self) -> None:
        self._fast: dict[str, Fast] = {}
        self._looked: set[str] = set()

    # ------------------------------------------------ what a kind of fluid must say
    @abstractmethod
    def available(self) -> tuple[str, ...]:
        """Names of the properties that this fluid has.

        Returns
        -------
        tuple of str
            In the order of tables.
        """

    @property
    @abstractmethod
    def cautions(self) -> tuple[str, ...]:
        """What a user should know whatever property is asked."""

    @abstractmethod
    def _record_range(self, prop: str) -> Range:
        """Stated temperature range of a property."""

    @abstractmethod
    def _record_scalar(self, prop: str) -> Callable[[float], float] | None:
        """The quick evaluator for one temperature, or None where the composition is an array."""

    @abstractmethod
    def _record_fill(
        self, prop: str, part: slice, temperature: FloatArray, out: FloatArray
    ) -> None:
        """Evaluate a flat chunk; `part` says which elements of the broadcast it covers."""

    @abstractmethod
    def _record_trail(self, prop: str, temperature: float | FloatArray | None) -> Trail:
        """How the property is made inside its range."""

    @abstractmethod
    def _record_blocks(self, prop: str) -> Sequence[PropertyRecord]:
        """The records that a property rests on, at whatever temperature."""

    def _record_settle(self, prop: str, temperature: Any, outside: str) -> Any:
        """Apply the range policy to the composition; the mask that becomes NaN."""
        return False

    def _is_quotient(self, prop: str) -> bool:
        """Whether a property follows from two others: kinematic viscosity, unless it is given."""
        return prop == "kinematic_viscosity"

    # ------------------------------------------------ the same, quotients included
    def _range(self, prop: str) -> Range:
        if not self._is_quotient(prop):
            return self._record_range(prop)
        first, second = (self._record_range(part) for part in QUOTIENT)
        low, high = max(first.low, second.low), min(first.high, second.high)
        if low > high:
            raise MissingProperty(
                f"{self.name}: viscosity and density hold at different temperatures",
                hint="Give both at the same temperature, or as (temperature, value) pairs",
            )
        return Range(low, high)

    def _scalar(self, prop: str) -> Callable[[float], float] | None:
        if not self._is_quotient(prop):
            return self._record_scalar(prop)
        viscosity, density = (self._record_scalar(part) for part in QUOTIENT)
        if viscosity is None or density is None:
            return None
        top, bottom = viscosity, density
        return lambda temperature: top(temperature) / bottom(temperature)

    def _fill(self, prop: str, part: slice, temperature: FloatArray, out: FloatArray) -> None:
        if not self._is_quotient(prop):
            self._record_fill(prop, part, temperature, out)
            return
        density = np.empty_like(out)
        self._record_fill("viscosity", part, temperature, out)
        self._record_fill("density", part, temperature, density)
        np.divide(out, density, out=out)

    def _blocks(self, prop: str) -> Sequence[PropertyRecord]:
        parts = QUOTIENT if self._is_quotient(prop) else (prop,)
        return [block for part in parts for block in self._record_blocks(part)]

    def _settle_point(self, prop: str, temperature: Any, outside: str) -> Any:
        parts = QUOTIENT if self._is_quotient(prop) else (prop,)
        mask: Any = False
        for part in parts:
            mask = mask | self._record_settle(part, temperature, outside)
        return mask

    def _trail(self, prop: str, temperature: float | FloatArray | None) -> Trail:
        if self._is_quotient(prop):
            trail = quotient_trail([self._record_trail(part, temperature) for part in QUOTIENT])
        else:
            trail = self._record_trail(prop, temperature)
        if temperature is None:
            return trail
        limits = self._range(prop)
        outside = ~np.asarray(limits.holds(np.asarray(temperature, dtype=float)))
        if not (outside.any() or np.any(self._settle_point(prop, temperature, "nan"))):
            return trail
        caution = f"extrapolated: outside its stated range, {limits}; no uncertainty is known there"
        return replace(trail, uncertainty=None, cautions=(*trail.cautions, caution))

    def _shape(self) -> tuple[int, ...]:
        """Shape of the composition; () for one composition."""
        return ()

    @abstractmethod
    def _broadcast(self, shape: tuple[int, ...]) -> Evaluation:
        """The same fluid with its composition broadcast to `shape` and made flat."""

    def _missing(self, prop: str) -> MissingProperty:
        has = self.available()
        return MissingProperty(
            f"{self.name} has no {prop}",
            allowed="it has " + ", ".join(has),
            hint=f"If you have measured it, add it: with_values({prop}=...)",
        )

    # ------------------------------------------------ evaluation
    def _look(self, prop: str, temperature: Any, outside: Outside) -> Any:
        if type(temperature) is float and outside == "raise":
            fast = self._fast.get(prop)
            if fast is not None:
                low, high, value = fast
                if low <= temperature <= high:
                    return value(temperature)
        check_outside(outside)
        kelvin, asked = units.read(temperature, "temperature", "temperature")
        fast = self._fast.get(prop)
        if fast is not None and type(kelvin) is float and fast.low <= kelvin <= fast.high:
            return units.give(fast.value(kelvin), prop, asked)
        self._warn_if_recalled(prop)
        return units.give(self._evaluate(prop, kelvin, outside), prop, asked)

    def _warn_if_recalled(self, prop: str) -> None:
        """One warning per fluid and property where a record from memory enters."""
        if prop in self._looked or prop not in self.available():
            return
        self._looked.add(prop)
        used = [block.label for block in self._blocks(prop) if block.grade == "recalled"]
        if used:
            warn_user(
                f"{prop} of {self.name} rests on memory ({', '.join(used)}; grade 'recalled'): "
                "uncertain by 5 % at least",
                RecalledWarning,
            )

    def _evaluate(self, prop: str, temperature: Any, outside: Outside) -> Any:
        """A property at SI temperatures: float, array or Series, with the range policy applied."""
        if prop not in self.available():
            raise self._missing(prop)
        if hasattr(temperature, "index") and hasattr(temperature, "to_numpy"):
            values = self._evaluate(prop, temperature.to_numpy(dtype=float), outside)
            if values.shape != temperature.shape:
                raise BadInput(
                    f"A Series of {len(temperature)} temperatures does not fit compositions of "
                    f"shape {self._shape()}",
                    allowed="as many as there are compositions, or an array",
                )
            return type(temperature)(values, index=temperature.index, name=prop)
        limits = self._range(prop)
        if isinstance(temperature, np.ndarray) and self._composition_is_settled():
            good = self._all_inside(prop, temperature, limits)
            if good is not None:
                return good
        lost: Any = False
        if not limits.covers(temperature):
            lowest = np.fmin.reduce(np.ravel(temperature), initial=np.inf)
            hint = KELVIN_HINT if lowest < 150.0 and limits.low > 150.0 else ""
            lost = settle(f"{prop} of {self.name}", temperature, limits, outside, hint=hint)
        unfit = self._settle_point(prop, temperature, outside)
        if not isinstance(temperature, np.ndarray) and self._shape() == ():
            return self._one(prop, temperature, limits, lost, unfit)
        return self._many(prop, temperature, limits, lost, unfit)

    def _without_gaps(self, prop: str) -> bool:
        """Whether every temperature between the ends of the range is served."""
        return True

    def _composition_is_settled(self) -> bool:
        """Whether only the temperature can be out of range."""
        return True

    def _all_inside(self, prop: str, temperature: FloatArray, limits: Range) -> Any:
        """Values where all temperatures are in range, else None; checks ride on the chunks."""
        flat = temperature.reshape(-1)
        out = np.empty(flat.size)
        for start in range(0, flat.size, CHUNK):
            part = slice(start, start + CHUNK)
            piece, values = flat[part], out[part]
            if not limits.covers(piece):
                return None
            self._fill(prop, part, piece, values)
            if not (values.min() > 0.0 and values.max() < np.inf):
                return None
        return out.reshape(temperature.shape)

    def _one(self, prop: str, temperature: float, limits: Range, lost: Any, unfit: Any) -> float:
        value = self._scalar(prop)
        assert value is not None
        # Quick look-ups skip the range policy, so they are for what is in range whatever it is.
        middle = 0.5 * (limits.low + limits.high)
        inside = not np.any(self._settle_point(prop, middle, "nan"))
        if inside and self._without_gaps(prop):
            self._fast.setdefault(prop, Fast(limits.low, limits.high, value))
        # Written so that NaN comes out as NaN without a warning.
        if lost or unfit or temperature != temperature:
            return float("nan")
        if temperature < 0.5 * limits.low:
            return self._not_finite(prop, 1)
        try:
            result = value(temperature)
        except (ArithmeticError, ValueError):
            return self._not_finite(prop, 1)
        if not 0.0 < result < float("inf"):
            return self._not_finite(prop, 1)
        return result

    def _many(self, prop: str, temperature: Any, limits: Range, lost: Any, unfit: Any) -> Any:
        shape = self._common_shape(temperature)
        flat = np.broadcast_to(temperature, shape).reshape(-1)
        fluid = self._broadcast(shape)
        work = np.empty(flat.size)
        with np.errstate(all="ignore"):
            for start in range(0, flat.size, CHUNK):
                part = slice(start, start + CHUNK)
                fluid._fill(prop, part, flat[part], work[part])
        out = work.reshape(shape)
        # NaN fails these comparisons and takes the long way.
        good = out.size == 0 or (out.min() > 0.0 and out.max() < np.inf)
        inside = lost is False and unfit is False and limits.covers(np.asarray(temperature))
        if good and (inside or not out.size):
            return out
        asked_nan = np.broadcast_to(np.isnan(temperature), shape)
        deep = np.broadcast_to(np.asarray(temperature) < 0.5 * limits.low, shape)
        gone = np.broadcast_to(np.asarray(lost) | np.asarray(unfit), shape)
        broken = ~((out > 0.0) & (out < np.inf)) | deep
        if broken.any() or gone.any():
            fresh = int((broken & ~asked_nan & ~gone).sum())
            out[broken | gone] = np.nan
            if fresh:
                self._not_finite(prop, fresh)
        return out

    def _common_shape(self, temperature: Any) -> tuple[int, ...]:
        """Shape of a result; BadInput where temperatures and compositions don't fit together."""
        try:
            return np.broadcast_shapes(np.shape(temperature), self._shape())
        except ValueError:
            raise BadInput(
                f"Temperatures of shape {np.shape(temperature)} don't fit compositions of shape "
                f"{self._shape()}",
                allowed="shapes that broadcast",
                hint="For every combination of the two use dk.grid()",
            ) from None

    def _not_finite(self, prop: str, count: int) -> float:
        many = "1 value" if count == 1 else f"{count} values"
        warn_user(
            f"{prop} of {self.name}: {many} far outside the range came out non-finite or not "
            "positive and became NaN",
            DropkitWarning,
        )
        return float("nan")
