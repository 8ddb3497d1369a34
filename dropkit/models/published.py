"""What every published model says of itself, and how it treats values outside its range."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Final

import numpy as np

from dropkit.validity import Range, check_outside, settle

__all__ = ["MARKS", "Published", "blank_outside", "outside_mask"]

# How far the formula of a model can be trusted.
MARKS: Final[dict[str, str]] = {
    "S": "seen in the text or abstract of the source itself",
    "S2": "seen as someone else's copy of the source",
    "M": "from memory, not seen",
    "M+": "from memory, and it passes an independent check that is stated beside it",
    "C": "derived or computed from a stated closed formula",
}


@dataclass(frozen=True, slots=True)
class Published:
    """The statement of one published model: each model file holds one, named ``MODEL``.

    Parameters
    ----------
    gives : str
        What the model gives, in a few words.
    holds : str
        When it holds, in words.
    sources : tuple of str
        Source keys, names of files in ``data/sources``.
    mark : str
        How the formula was seen: a key of `MARKS`.
    place : str
        Equation, table or page.
    ranges : tuple of Range
        The ranges that its functions check.
    agreement : str
        How well it agrees with measured points, with the number of points; or that none were found.
    """

    gives: str
    holds: str
    sources: tuple[str, ...]
    mark: str
    place: str
    ranges: tuple[Range, ...] = ()
    agreement: str = ""


def outside_mask(subject: str, outside: str, *checked: tuple[Any, Range]) -> Any:
    """Apply the range policy to several quantities of one model at once.

    Parameters
    ----------
    subject : str
        The model's name, for messages.
    outside : str
        The policy: ``"raise"``, ``"warn"``, ``"nan"`` or ``"allow"``.
    *checked : (float or array, Range)
        Each quantity [SI] with the range that it must keep.

    Returns
    -------
    bool or array of bool
        Where the result must become NaN.

    Raises
    ------
    OutOfRange
        Under ``"raise"``, naming the quantity, the count and the first elements.
    BadInput
        For another word.

    Examples
    --------
    >>> outside_mask("growth", "nan", (1.2, Range(0.0, 1.0, "reduced wavenumber", "")))
    True
    """
    check_outside(outside)
    mask: Any = False
    for value, limits in checked:
        mask = mask | settle(subject, value, limits, outside)
    return mask


def blank_outside(value: Any, mask: Any) -> Any:
    """A result with NaN where `outside_mask` said so.

    Parameters
    ----------
    value : float or array
        The result.
    mask : bool or array of bool
        From `outside_mask`.

    Returns
    -------
    float or array
        In the broadcast shape of both.

    Examples
    --------
    >>> blank_outside(2.0, False), blank_outside(2.0, True)
    (2.0, nan)
    """
    if mask is False:
        return value
    if mask is True and not isinstance(value, np.ndarray):
        return float("nan")
    return np.where(mask, np.nan, value)
