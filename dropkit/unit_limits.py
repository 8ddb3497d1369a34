"""Domains and plausibility of SI values, with the likely slip named."""

from __future__ import annotations

import math
from typing import Any, Final

import numpy as np

from dropkit.errors import ImplausibleValue, Unphysical
from dropkit.unit_table import ZERO_CELSIUS, Kind
from dropkit.validity import Domain, check_domain

__all__ = ["check_domain_of", "check_plausible", "inside", "kelvin_hint"]

COLD: Final = 150.0  # K; below it a bare temperature was probably meant in degC


def kelvin_hint(value: Any) -> str:
    """The reminder that belongs to every error about a bare temperature below 150 K.

    Parameters
    ----------
    value : float or array
        Bare temperatures [K].

    Returns
    -------
    str
        Empty where none lies below 150 K.

    Examples
    --------
    >>> kelvin_hint(25.0)
    'kelvin expected; 25 degC is 298.15'
    """
    low = np.ravel(np.asarray(value, dtype=np.float64))
    low = low[low < COLD]
    if low.size == 0:
        return ""
    return f"kelvin expected; {low[0]:g} degC is {low[0] + ZERO_CELSIUS:.10g}"


def inside(value: Any, domain: Domain) -> bool:
    """True if a float or float array lies in its domain; NaN and infinity give False.

    Parameters
    ----------
    value : float or numpy.ndarray
        The value [SI].
    domain : str
        One of the four domains.

    Returns
    -------
    bool
        False asks for the slow check, which lets NaN pass.
    """
    if type(value) is float:
        low = high = value
    elif value.size == 0:
        return True
    else:
        low, high = value.min(), value.max()
    if domain == "> 0":
        return bool(low > 0.0 and high < math.inf)
    if domain == ">= 0":
        return bool(low >= 0.0 and high < math.inf)
    if domain == "0..1":
        return bool(low >= 0.0 and high <= 1.0)
    return bool(low > -math.inf and high < math.inf)


def check_domain_of(name: str, value: Any, kind: Kind, domain: Domain, given: str) -> None:
    """Raise Unphysical outside the domain, with the likely slip named.

    `given` is how a value with a unit was written; empty for a bare one.
    """
    try:
        check_domain(name, value, domain)
    except Unphysical as error:
        hint = ""
        if kind.name == "temperature" and not given:
            hint = kelvin_hint(value)
        elif domain == "0..1":
            high = np.ravel(value)[np.ravel(value) > 1.0]
            if high.size and high[0] <= 100.0 and "percent" in kind.accepts:
                hint = f"Per cent are written '{high[0]:g} %', a fraction {high[0] / 100:g}"
        unit = f" {kind.si}" if kind.si else ""
        source = f" (given as {given})" if given else ""
        what = error.what.replace(" (SI)", f"{unit}{source}")
        raise Unphysical(what, allowed=error.allowed, hint=hint) from None


def check_plausible(name: str, value: Any, kind: Kind, given: str) -> None:
    """Raise ImplausibleValue outside the kind's window, with the likely slip named."""
    if kind.plausible is None:
        return
    low, high = kind.plausible
    cold = kind.name == "temperature" and not given
    if cold:
        low = COLD
    flat = np.ravel(value)
    bad = flat[(flat < low) | (flat > high)]
    if bad.size == 0:
        return
    first = float(bad[0])
    count = f" ({bad.size} of {flat.size} elements)" if flat.size > 1 else ""
    hint = next((s.hint(first, kind.si) for s in kind.slips if s.low <= first <= s.high), "")
    if cold:
        hint = kelvin_hint(first)
    raise ImplausibleValue(
        f"{name} = {first:g} {kind.si}".rstrip() + f"{count} is implausible for {kind.words}",
        allowed=f"{low:g} to {high:g} {kind.si}".rstrip(),
        hint=". ".join(filter(None, (hint, "plausible=False lets it pass"))),
    )
