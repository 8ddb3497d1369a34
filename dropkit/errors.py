"""Every exception and warning of dropkit.

Each error says what was given, what is allowed, the nearest valid choice and
what to do next. Each class is also the natural built-in exception, so that
``except ValueError`` keeps working in programs that do not know dropkit.
"""

from __future__ import annotations

import sys
import warnings
from collections.abc import Iterable, Sequence

__all__ = [
    "AmbiguousName",
    "BadInput",
    "BasisMissing",
    "CompositionError",
    "DropkitError",
    "DropkitWarning",
    "EngineError",
    "EstimateRefused",
    "EstimateWarning",
    "ImplausibleValue",
    "MissingProperty",
    "NotALiquid",
    "OutOfRange",
    "RangeWarning",
    "RecalledWarning",
    "RecordError",
    "UnitError",
    "UnknownName",
    "Unphysical",
    "nearest",
    "warn_user",
]


def nearest(word: str, choices: Iterable[str], count: int = 3) -> list[str]:
    """The choices that look most like `word`, best first.

    Examples
    --------
    >>> nearest("glicerol", ["glycerol", "water"])
    ['glycerol']
    """
    # Imported here: only a slip needs it.
    from difflib import get_close_matches

    known = {choice.casefold(): choice for choice in choices}
    close = get_close_matches(word.casefold(), known, n=count, cutoff=0.6)
    return [known[name] for name in close]


class DropkitError(Exception):
    """Base of all errors that dropkit raises.

    Parameters
    ----------
    what : str
        What was wrong, with the offending value.
    allowed : str, optional
        What would have been accepted.
    choices : sequence of str, optional
        The nearest valid choices, best first.
    hint : str, optional
        What to do next.
    """

    def __init__(
        self,
        what: str,
        *,
        allowed: str = "",
        choices: Sequence[str] = (),
        hint: str = "",
    ) -> None:
        super().__init__(what)
        self.what = what
        self.allowed = allowed
        self.choices = tuple(choices)
        self.hint = hint

    def __str__(self) -> str:
        parts = [self.what]
        if self.allowed:
            parts.append(f"Allowed: {self.allowed}")
        if self.choices:
            quoted = [f"'{choice}'" for choice in self.choices]
            if len(quoted) > 1:
                quoted[-2:] = [f"{quoted[-2]} or {quoted[-1]}"]
            parts.append(f"Did you mean {', '.join(quoted)}?")
        if self.hint:
            parts.append(self.hint)
        return " ".join(part if part.endswith((".", "?")) else f"{part}." for part in parts)

    def __reduce__(self) -> tuple[object, ...]:
        # Keyword-only fields do not survive the default pickling of exceptions.
        return (_rebuild, (type(self), self.what, self.allowed, self.choices, self.hint))


def _rebuild(
    kind: type[DropkitError], what: str, allowed: str, choices: tuple[str, ...], hint: str
) -> DropkitError:
    return kind(what, allowed=allowed, choices=choices, hint=hint)


class BadInput(DropkitError, ValueError):
    """Input of the wrong type or form: bool, complex, text in an array, an unreadable string."""


class UnitError(BadInput):
    """A unit that is unknown, ambiguous, or of the wrong dimension."""


class ImplausibleValue(BadInput):
    """A value with a valid unit that no liquid has; ``plausible=False`` lets it pass."""


class Unphysical(BadInput):
    """A value that cannot exist: a temperature at or below 0 K, a negative size, infinity."""


class CompositionError(BadInput):
    """A composition that does not add up or mixes its bases."""


class BasisMissing(CompositionError):
    """Bare fractions without ``by="mass"``, ``"mole"`` or ``"volume"``."""


class OutOfRange(DropkitError, ValueError):
    """A valid value outside the stated range of a record or model."""


class UnknownName(DropkitError, KeyError):
    """No liquid, property or unit of that name is known."""


class AmbiguousName(DropkitError, LookupError):
    """A name that stands for several liquids."""


class MissingProperty(DropkitError, LookupError):
    """The records hold no such property for this liquid or mixture."""


class EstimateRefused(MissingProperty):
    """The property could only be estimated, and estimates are refused or known to fail."""


class NotALiquid(DropkitError, ValueError):
    """A solid or a gas was asked for as if it were a liquid."""


class RecordError(DropkitError, ValueError):
    """A data record that is unreadable, incomplete, contradictory or changed since it was sealed."""


class EngineError(DropkitError, RuntimeError):
    """A property engine (CoolProp, thermo) could not give a trustworthy value."""


class DropkitWarning(UserWarning):
    """Base of all warnings of dropkit."""


class RangeWarning(DropkitWarning):
    """Values outside a stated range were computed because ``outside="warn"``."""


class EstimateWarning(DropkitWarning):
    """A mixture was made whose properties are partly estimated."""


class RecalledWarning(DropkitWarning):
    """A record holds a value from memory, without a source that was seen."""


def warn_user(text: str, category: type[DropkitWarning]) -> None:
    """Warn at the line of the user's that led here, however many of dropkit's lie between.

    Parameters
    ----------
    text : str
        What happened.
    category : type
        One of the warnings of this module.
    """
    frame, level = sys._getframe(1), 2
    while frame.f_back is not None and frame.f_globals.get("__name__", "").startswith("dropkit."):
        frame, level = frame.f_back, level + 1
    warnings.warn(text, category, stacklevel=level)
