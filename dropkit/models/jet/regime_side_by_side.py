"""Regimes of a jet, every criterion with its source, and where the authors disagree."""

from __future__ import annotations

from dataclasses import dataclass
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit.errors import BadInput
from dropkit.models.jet.regime_jetting_gravity import jetting_weber_gravity
from dropkit.models.jet.regime_jetting_weber import JETTING_WEBER
from dropkit.models.jet.regime_wind_viscous import first_wind_weber_viscous
from dropkit.models.jet.regime_wind_weber import (
    ATOMISATION_WEBER,
    FIRST_WIND_WEBER,
    SECOND_WIND_WEBER,
)
from dropkit.models.published import Published
from dropkit.numbers.capillarity import gas_weber, weber
from dropkit.numbers.viscocapillarity import ohnesorge

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["REGIMES", "JetRegimes", "RegimeCriterion", "jet_regimes"]

REGIMES: Final = (
    "dripping",
    "Rayleigh",
    "first wind-induced",
    "second wind-induced",
    "atomisation",
)
# Liquid Weber number on the diameter: twice 3.12255 on the radius [C], inviscid, one speed.
ABSOLUTE_WEBER: Final = 6.2451

MODEL: Final = Published(
    gives="the regime of a jet by every criterion",
    holds="round jets of Newtonian liquids into still gas of less than 1/500 of their density, long smooth "
    "nozzles; turbulence and cavitation in the nozzle shift the upper limits by a factor of several",
    sources=(
        "LinReitz1998",
        "SterlingSleicher1975",
        "ClanetLasheras1999",
        "LeibGoldstein1986",
        "TrettelCompilation",
        "Trettel2020",
    ),
    mark="S2",
    place="We = 8, 6.25 or Clanet & Lasheras; We_g = 0.4 or 1.2 + 3.41 Oh^0.9, 13, 40.3",
    agreement="230 jets with a compiler's label: 0.4, 13 and 40.3 put 153 where the label does, with "
    "1.2 + 3.41 Oh^0.9 in place of 0.4 it is 175; where both say the same (184 jets) 141 agree with the "
    "label. The compiler finds such maps too inaccurate to decide, and adds turbulence as an axis",
)


@dataclass(frozen=True, slots=True)
class RegimeCriterion:
    """One criterion with its value, its limit and what it says.

    Parameters
    ----------
    name : str
        What it separates.
    number : str
        The number that is compared.
    value, limit : float or array
        The number of this jet, and where the criterion sees the change [-].
    verdict : str or array of str
        What lies on this side of the limit.
    source : str
        Key of the source, a file in ``data/sources``.
    seen : str
        How the criterion was seen: a key of `dropkit.models.published.MARKS`.
    note : str
        What else to know.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> found = jet.jet_regimes(998.2, 1e-3, 0.0727, 12.0, 60e-6, 1.2)
    >>> print(found.criteria[0])
    dripping - jetting: We 119 of 8 (LinReitz1998), jets
    """

    name: str
    number: str
    value: Any
    limit: Any
    verdict: Any
    source: str
    seen: str
    note: str = ""

    @property
    def margin(self) -> Any:
        """The value over the limit [-]."""
        return self.value / self.limit

    def __str__(self) -> str:
        if np.ndim(self.verdict):
            return f"{self.name}: {self.number}, {np.size(self.verdict)} jets ({self.source})"
        limit = float(self.limit)
        return (
            f"{self.name}: {self.number} {float(self.value):.3g} of {limit:.3g} ({self.source}), "
            f"{self.verdict}"
        )


@dataclass(frozen=True, slots=True)
class JetRegimes:
    """The regime of a jet by every criterion, with the disagreement of their authors.

    Parameters
    ----------
    regime : str or array of str
        By the limits most often quoted: the liquid's Weber number 8, or Clanet & Lasheras where
        the tube is known, then 0.4, 13 and 40.3 of the gas.
    mildest, strongest : str or array of str
        The first and the last regime, in the order of `REGIMES`, that any choice of criteria gives.
    criteria : tuple of RegimeCriterion
        Every criterion.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> found = jet.jet_regimes(998.2, 1e-3, 0.0727, 30.0, 60e-6, 1.2)
    >>> found.regime, found.mildest, bool(found.agreed)
    ('first wind-induced', 'Rayleigh', False)
    """

    regime: Any
    mildest: Any
    strongest: Any
    criteria: tuple[RegimeCriterion, ...]

    @property
    def agreed(self) -> Any:
        """Where every choice of criteria gives the same regime."""
        return self.mildest == self.strongest

    def table(self) -> pd.DataFrame:
        """One row per criterion for one jet, one row per jet for arrays.

        Returns
        -------
        pandas.DataFrame
            Value, limit, margin, verdict, source, how it was seen and note of each criterion; for
            arrays regime, mildest, strongest, agreed and the verdict of each criterion.

        Examples
        --------
        >>> from dropkit.models import jet
        >>> found = jet.jet_regimes(998.2, 1e-3, 0.0727, 30.0, 60e-6, 1.2)
        >>> found.table()["limit"].round(3).tolist()
        [8.0, 6.245, 0.4, 1.279, 13.0, 40.3]
        """
        import pandas as pd

        if np.ndim(self.regime) == 0:
            rows = [
                {
                    "criterion": each.name,
                    "number": each.number,
                    "value": float(each.value),
                    "limit": float(each.limit),
                    "margin": float(each.margin),
                    "verdict": each.verdict,
                    "source": each.source,
                    "seen": each.seen,
                    "note": each.note,
                }
                for each in self.criteria
            ]
            return pd.DataFrame(rows)
        columns = {
            "regime": self.regime,
            "mildest": self.mildest,
            "strongest": self.strongest,
            "agreed": self.agreed,
        }
        columns |= {f"{each.name} ({each.source})": each.verdict for each in self.criteria}
        return pd.DataFrame({name: np.ravel(column) for name, column in columns.items()})

    def __str__(self) -> str:
        if np.ndim(self.regime):
            return f"regimes of {np.size(self.regime)} jets"
        if self.agreed:
            return f"{self.regime}, by every criterion"
        return f"{self.regime}; authors differ, from {self.mildest} to {self.strongest}"


def jet_regimes(
    density: Any,
    viscosity: Any,
    surface_tension: Any,
    velocity: Any,
    jet_diameter: Any,
    gas_density: Any,
    *,
    nozzle_diameter: Any = None,
    outer_diameter: Any = None,
    gravity: Any = 9.80665,
) -> JetRegimes:
    """The regime of a jet by every published criterion, side by side.

    Holds for round jets of Newtonian liquids into still gas of less than 1/500 of their density, from
    long smooth nozzles. Turbulence and cavitation shift the upper limits by a factor of several.

    Parameters
    ----------
    density : float, array or quantity
        Density of the liquid [kg/m3].
    viscosity : float, array or quantity
        Dynamic viscosity [Pa*s].
    surface_tension : float, array or quantity
        Surface tension [N/m].
    velocity : float, array or quantity
        Speed of the jet [m/s].
    jet_diameter : float, array or quantity
        Diameter of the jet [m].
    gas_density : float, array or quantity
        Density of the gas [kg/m3].
    nozzle_diameter, outer_diameter : float, array or quantity, optional
        Inner and outer diameter of a tube that points down [m]; both, or neither. With them the
        criterion of Clanet & Lasheras, on the mean speed inside, decides on dripping.
    gravity : float, array or quantity
        Acceleration of gravity [m/s2].

    Returns
    -------
    JetRegimes
        The regime by the limits most often quoted, what other choices would give, and every
        criterion with value, limit, margin, verdict and source.

    Raises
    ------
    BadInput
        For one of the two diameters without the other, or shapes that do not broadcast.
    UnitError, Unphysical
        An argument of another dimension, or outside its domain.

    Notes
    -----
    The limits of 0.4 and of 1.2 + 3.41 Oh^0.9 part the Rayleigh regime from the first wind-induced one
    by a factor of 3 and more in the gas Weber number. The lower one is the default, because below it
    everybody agrees.

    Examples
    --------
    >>> from dropkit.models import jet
    >>> water = ("998.2 kg/m3", "1 mPa*s", "72.7 mN/m")
    >>> print(jet.jet_regimes(*water, "12 m/s", "60 um", "1.2 kg/m3"))
    Rayleigh, by every criterion
    >>> print(jet.jet_regimes(*water, "30 m/s", "60 um", "1.2 kg/m3"))
    first wind-induced; authors differ, from Rayleigh to first wind-induced
    """
    if (nozzle_diameter is None) != (outer_diameter is None):
        raise BadInput(
            "of nozzle_diameter and outer_diameter one is missing", allowed="both, or neither"
        )
    liquid = _plain(weber(density, surface_tension, velocity, jet_diameter))
    gas = _plain(gas_weber(surface_tension, velocity, jet_diameter, gas_density))
    oh = _plain(ohnesorge(density, viscosity, surface_tension, jet_diameter))
    first = _plain(first_wind_weber_viscous(density, viscosity, surface_tension, jet_diameter))
    tube = None
    if nozzle_diameter is not None:
        limit = _plain(
            jetting_weber_gravity(
                density, surface_tension, nozzle_diameter, outer_diameter, gravity
            )
        )
        # The same flow through the bore: V = U (d/D)^2, so that the number goes with (d/D)^3.
        inside = (
            liquid
            * (liquid / _plain(weber(density, surface_tension, velocity, nozzle_diameter))) ** 3
        )
        tube = (inside, limit)
    try:
        shape = np.broadcast_shapes(*(np.shape(each) for each in (liquid, gas, oh, *(tube or ()))))
    except ValueError:
        raise BadInput(
            "jet_regimes: the shapes do not broadcast",
            allowed="equal shapes, or lengths of 1 by numpy's rules",
        ) from None
    return _compare(shape, liquid, gas, first, tube)


def _compare(shape: tuple[int, ...], liquid: Any, gas: Any, first: Any, tube: Any) -> JetRegimes:
    criteria = [
        _criterion(
            "dripping - jetting", "We", liquid, JETTING_WEBER, ("drips", "jets"), shape,
            "LinReitz1998", "S2", "gravity and the tube left out",
        ),
        _criterion(
            "dripping - jetting", "We", liquid, ABSOLUTE_WEBER, ("drips", "jets"), shape,
            "LeibGoldstein1986", "C", "absolute instability, inviscid, one speed; less with viscosity",
        ),
    ]  # fmt: skip
    if tube is not None:
        inside, limit = tube
        criteria.insert(
            0,
            _criterion(
                "dripping - jetting", "We inside", inside, limit, ("drips", "jets"), shape,
                "ClanetLasheras1999", "S2", "tube pointing down, with gravity",
            ),
        )  # fmt: skip
    dripping = [each.margin < 1.0 for each in criteria]
    firsts = (FIRST_WIND_WEBER, first)
    sources = ("LinReitz1998", "SterlingSleicher1975")
    for limit, source in zip(firsts, sources, strict=True):
        criteria.append(
            _criterion(
                "Rayleigh - first wind-induced", "We_g", gas, limit, ("gas idle", "gas helps"),
                shape, source, "S2",
            )
        )  # fmt: skip
    for name, limit, sides in (
        ("first - second wind-induced", SECOND_WIND_WEBER, ("not stripped", "stripped")),
        ("second wind-induced - atomisation", ATOMISATION_WEBER, ("not atomised", "atomised")),
    ):
        criteria.append(
            _criterion(name, "We_g", gas, limit, sides, shape, "LinReitz1998", "S2",
                       "nozzle turbulence and cavitation shift it by a factor of several")
        )  # fmt: skip
    higher = 2 + (gas >= SECOND_WIND_WEBER).astype(int) + (gas >= ATOMISATION_WEBER).astype(int)
    levels = [
        np.where(drips, 0, np.where(gas < limit, 1, higher))
        for drips in dripping
        for limit in firsts
    ]
    spread = np.stack([np.broadcast_to(level, shape) for level in levels])
    unknown = np.broadcast_to(np.isnan(liquid + gas + first + sum(tube or ())), shape)
    return JetRegimes(
        regime=_named(spread[0], unknown),
        mildest=_named(spread.min(axis=0), unknown),
        strongest=_named(spread.max(axis=0), unknown),
        criteria=tuple(criteria),
    )


def _criterion(
    name: str,
    number: str,
    value: Any,
    limit: Any,
    sides: tuple[str, str],
    shape: tuple[int, ...],
    source: str,
    seen: str,
    note: str = "",
) -> RegimeCriterion:
    value, limit = np.broadcast_to(value, shape), np.broadcast_to(limit, shape)
    verdict: Any = np.where(value < limit, sides[0], sides[1]).astype(object)
    verdict = np.where(np.isnan(value) | np.isnan(limit), "unknown", verdict)
    if not shape:
        return RegimeCriterion(
            name, number, float(value), float(limit), str(verdict), source, seen, note
        )
    return RegimeCriterion(name, number, value, limit, verdict, source, seen, note)


def _named(level: Any, unknown: Any) -> Any:
    names = np.where(unknown, "unknown", np.array(REGIMES, dtype=object)[level])
    return names if names.ndim else str(names)


def _plain(number: Any) -> Any:
    return np.asarray(number, dtype=np.float64)
