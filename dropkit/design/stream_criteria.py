"""What a stream must meet, each with value, limit, margin, verdict and source."""

from __future__ import annotations

import math
from dataclasses import dataclass, replace
from typing import Any, Final

import numpy as np

from dropkit.design.stream_hole import LAMINAR_END, TURBULENT_START, Hole
from dropkit.design.stream_solver import Liquid
from dropkit.models import jet, nozzle

__all__ = ["CUT_OFF", "LOW_VISCOSITY_BAND", "Criterion", "Limits", "criteria"]

CUT_OFF: Final = math.pi
LOW_VISCOSITY_BAND: Final = (3.5, 7.0)
JETTING_WEBER: Final = 8.0
GAS_IDLE: Final = 0.4
REGIME_ENDS: Final = (0.4, 13.0, 40.3)
REGIMES: Final = ("Rayleigh", "first wind-induced", "second wind-induced", "atomisation")
LINEAR_DRIVE: Final = 0.2


@dataclass(frozen=True, slots=True)
class Limits:
    """Limits that the user sets, SI; None where there is none.

    Parameters
    ----------
    pressure, shear_rate, distance : float, array or None
        Highest gauge pressure [Pa], highest shear rate at the wall [1/s], and the distance within
        which the jet must have broken up [m].
    share : float
        Growth at the ends of the band over its maximum [-].
    ambient_pressure : float or array
        Around the outlet [Pa].
    vapour_pressure : float, array or None
        Of the liquid [Pa].
    gas_density : float or array
        Around the jet [kg/m3].
    """

    pressure: Any = None
    shear_rate: Any = None
    distance: Any = None
    share: Any = 0.8
    ambient_pressure: Any = 101325.0
    vapour_pressure: Any = None
    gas_density: Any = 1.2


@dataclass(frozen=True, slots=True)
class Criterion:
    """One thing that a stream must meet.

    Parameters
    ----------
    name : str
        What is judged.
    kind : str
        Kind of value and limits.
    value, low, high : ndarray
        The value and the ends of what is good, NaN where there is no end.
    margin : ndarray
        Distance to the nearest limit over that limit: 0 at it, negative beyond.
    met : ndarray of float
        1 where met, 0 where failed, 0.5 where doubtful, NaN where undetermined.
    words : tuple of str
        What can be so, in the words of the trade.
    code : ndarray of int
        Which of them.
    source : str
        Keys of the sources, or whose limit it is.
    note : str
        What else to know.
    """

    name: str
    kind: str
    value: Any
    low: Any
    high: Any
    margin: Any
    met: Any
    words: tuple[str, ...]
    code: Any
    source: str
    note: str = ""

    @property
    def verdict(self) -> Any:
        """What is so, an array of text."""
        return np.array(self.words, dtype=object)[self.code]


def single(value: Any) -> Any:
    """A float where there is one element: the scalar way through a model costs a fifth."""
    return float(value.item()) if isinstance(value, np.ndarray) and value.size == 1 else value


def _criterion(
    name: str,
    kind: str,
    value: Any,
    words: tuple[str, str],
    source: str,
    *,
    low: Any = math.nan,
    high: Any = math.nan,
    doubtful: Any = False,
    doubt: str = "",
    note: str = "",
) -> Criterion:
    """Compare; `words` says what is so where met, and where not."""
    value = np.asarray(value, dtype=float)
    low, high = np.broadcast_to(low, value.shape), np.broadcast_to(high, value.shape)
    with np.errstate(all="ignore"):
        margin = np.fmin(value / low - 1.0, 1.0 - value / high)
    unknown = np.isnan(margin)
    unsure = np.asarray(doubtful) & ~unknown
    good = margin >= 0.0
    code = np.where(unknown, 0, np.where(unsure, 3, np.where(good, 1, 2)))
    met = np.array((np.nan, 1.0, 0.0, 0.5))[code]
    said = ("undetermined", *words, doubt)
    return Criterion(name, kind, value, low, high, margin, met, said, code, source, note)


def criteria(
    found: dict[str, Any], liquid: Liquid, hole: Hole, limits: Limits
) -> tuple[Criterion, ...]:
    """Judge streams.

    Parameters
    ----------
    found : dict of str to ndarray
        From `quantities`.
    liquid : Liquid
        Density, viscosity, surface tension.
    hole : Hole
        Kind and length of the hole.
    limits : Limits
        Those that the user sets, and the surroundings.

    Returns
    -------
    tuple of Criterion
        In the order of tables.
    """
    return (
        *_of_jet(found, liquid, limits),
        *_of_hole(found, liquid, hole, limits),
        *_of_user(found, limits),
    )


def _of_jet(found: dict[str, Any], liquid: Liquid, limits: Limits) -> list[Criterion]:
    speed, d, ratio = found["velocity"], found["jet_diameter"], found["wavelength_ratio"]
    with np.errstate(all="ignore"):
        least = jet.jetting_velocity_weber.si(liquid.density, liquid.surface_tension, d)
        three = (liquid.density, liquid.viscosity, liquid.surface_tension)
        band = jet.growth_band_viscous_full.si(
            *(single(part) for part in (*three, d)), share=single(limits.share)
        )
        low, high = band.shortest / d, band.longest / d
        gas = found["gas_weber"]
        level = np.searchsorted(REGIME_ENDS, np.nan_to_num(gas), side="right")
        oh = found["ohnesorge"]
        milder = 1.2 + 3.41 * oh**0.9
    regime = _criterion(
        "regime", "ratio", gas, ("Rayleigh: surface tension breaks the jet", ""),
        "LinReitz1998, SterlingSleicher1975", high=GAS_IDLE,
        doubtful=(gas >= GAS_IDLE) & (gas < milder),
        doubt="Rayleigh or first wind-induced: authors differ",
        note="gas Weber number; 0.4 by one author, 1.2 + 3.41 Oh^0.9 by others; then 13 and 40.3",
    )  # fmt: skip
    regime = replace(
        regime,
        words=(*regime.words, *REGIMES),
        code=np.where(regime.code == 2, 4 + level, regime.code),
    )
    return [
        _criterion(
            "jetting", "velocity", speed, ("jets", "too slow, drips"), "LinReitz1998", low=least,
            doubtful=(found["weber"] < JETTING_WEBER) & (found["weber"] > 4.0),
            doubt="drips or jets: authors differ between Weber numbers of 4 and 8",
            note="Weber number 8 on the jet diameter; gravity and the wall of the tube left out",
        ),
        _criterion(
            "grows", "ratio", ratio, ("above the cut-off", "beyond cut-off: no wave grows"),
            "Rayleigh1878", low=CUT_OFF,
            note="wavelength over jet diameter; drops of 1.68 jet diameters mark the cut-off",
        ),
        _criterion(
            "wavelength", "ratio", ratio,
            ("inside the band", "too long: it grows slowly, and its harmonics may win"),
            "Chandrasekhar1961", low=low, high=high,
            doubtful=(ratio < low) & (ratio >= CUT_OFF),
            doubt="short: slow growth, drops may merge or scatter",
            note=f"growth at least {np.max(limits.share, initial=0.0):g} of its maximum at this liquid's "
            "Ohnesorge number; 3.5 to 7 is the low-viscosity value (SchneiderHendricks1964)",
        ),
        _criterion(
            "satellites", "ratio", ratio, ("satellites least likely", "satellites likely"),
            "PimbleyLee1977", low=5.0, high=7.0,
            doubtful=(ratio < 5.0) | (ratio > 7.0),
            doubt="satellites likely; the drive's amplitude decides how they merge",
            note="wavelength over jet diameter; one study with one liquid, no law in general",
        ),
        regime,
        *(
            [] if np.isnan(found["radius_amplitude"]).all() else [
                _criterion(
                    "drive", "ratio", 2.0 * found["radius_amplitude"] / d,
                    ("weak enough for the linear theory", "too strong for the linear theory"),
                    "Weber1931", high=LINEAR_DRIVE,
                    note="amplitude of the radius over the radius",
                )
            ]
        ),
    ]  # fmt: skip


def _of_hole(found: dict[str, Any], liquid: Liquid, hole: Hole, limits: Limits) -> list[Criterion]:
    reynolds, bore = found["reynolds"], found["nozzle_diameter"]
    with np.errstate(all="ignore"):
        slender = found["nozzle_length"] / bore
        inside = 4.0 * found["flow"] / (math.pi * bore * bore)
        entrance = nozzle.entrance_length_laminar.si(
            liquid.density, liquid.viscosity, inside, bore, outside="allow"
        )
    kind = hole.kind
    judged = [
        _criterion(
            "laminar", "ratio", reynolds, ("laminar", "turbulent in the hole"), "Merritt1967",
            high=LAMINAR_END, doubtful=(reynolds > LAMINAR_END) & (reynolds <= TURBULENT_START),
            doubt="laminar or turbulent: between 2100 and 4000 either",
            note="Reynolds number of the hole",
        ),
        _criterion(
            "hole length", "ratio", slender,
            ("its pressure model holds", "outside its pressure model"),
            ", ".join(kind.sources), low=kind.shortest * (1 - 1e-6) or math.nan,
            high=kind.longest * (1 + 1e-6),
            note=f"length over diameter; {kind.words}",
        ),
    ]  # fmt: skip
    if kind.name == "tube" and hole.contraction is None:
        judged.append(
            _criterion(
                "profile", "distance", found["nozzle_length"],
                ("parabolic at the end of the tube", ""), "MiddlemanGavis1961", low=entrance,
                doubtful=found["nozzle_length"] < entrance,
                doubt="still developing: the jet may be up to as wide as the tube",
                note="length of the tube against its entrance length; give `contraction` or "
                "`jet_diameter` where it was measured",
            )
        )  # fmt: skip
    if kind.name == "plate" and hole.contraction is None:
        judged.append(
            _criterion(
                "contraction", "ratio", reynolds, ("sharp-edge value", ""), "Britannica1911",
                low=2000.0, doubtful=reynolds < 2000.0,
                doubt="below a Reynolds number of 2000 the jet contracts less",
                note="0.787 of the hole in diameter",
            )
        )  # fmt: skip
    if limits.vapour_pressure is not None:
        judged += _of_vapour(found, liquid, hole, limits)
    return judged


def _of_vapour(
    found: dict[str, Any], liquid: Liquid, hole: Hole, limits: Limits
) -> list[Criterion]:
    vapour, around = limits.vapour_pressure, limits.ambient_pressure
    shape = found["velocity"].shape
    boiling = _criterion(
        "boiling", "ratio", np.broadcast_to(vapour / around, shape),
        ("stays liquid at the outlet", "flashes at the outlet: jet theory does not hold"),
        "vapour pressure of the liquid", high=1.0, note="vapour pressure over ambient pressure",
    )  # fmt: skip
    if hole.kind.name == "tube":
        return [boiling]
    with np.errstate(all="ignore"):
        pressure = found["gauge_pressure"]
        value = nozzle.cavitation_parameter.si(vapour, pressure, ambient_pressure=around)
        limit = nozzle.cavitation_inception_parameter.si(
            liquid.density, liquid.viscosity, pressure, found["nozzle_diameter"], outside="allow"
        )
    return [
        boiling,
        _criterion(
            "cavitation", "ratio", value, ("no cavitation", "cavitates"), "Nurick1976", low=limit,
            note="cavitation parameter of a sharp edge against its inception",
        ),
    ]  # fmt: skip


def _of_user(found: dict[str, Any], limits: Limits) -> list[Criterion]:
    """Against limits that the user sets; without one, the value stands alone."""
    rows = (
        ("pressure", "gauge_pressure", "gauge_pressure", limits.pressure,
         ("within the pressure limit", "needs more pressure than allowed")),
        ("wall shear", "shear_rate", "shear_rate", limits.shear_rate,
         ("within the shear limit", "shears the liquid more than allowed")),
        ("breakup", "distance", "breakup_length", limits.distance,
         ("breaks up in time", "still a jet at the stated distance")),
    )  # fmt: skip
    judged = []
    for name, kind, word, limit, words in rows:
        value = found[word]
        if limit is None:
            nan = np.full_like(value, np.nan)
            none = np.zeros(value.shape, dtype=int)
            judged.append(
                Criterion(name, kind, value, nan, nan, nan, nan, ("no limit given",), none, "yours")
            )
            continue
        options: dict[str, Any] = {}
        if name == "breakup":
            late = found["breakup_length_high"]
            options = {
                "doubtful": (value <= limit) & (late > limit),
                "doubt": "breaks up in time on average, not at the end of its band",
            }
        judged.append(_criterion(name, kind, value, words, "yours", high=limit, **options))
    return judged
