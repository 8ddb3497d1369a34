"""What measurements on the rig say of it: they replace the literature's values in a design."""

from __future__ import annotations

import math
from collections.abc import Mapping
from dataclasses import dataclass
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit import units
from dropkit.errors import BadInput
from dropkit.models import nozzle
from dropkit.properties import display
from dropkit.unit_table import kind_of

if TYPE_CHECKING:
    import pandas as pd

    from dropkit.design.stream_result import Stream

__all__ = ["Calibration", "calibrate"]

_MEASURED: Final[dict[str, str]] = {
    "gauge_pressure": "gauge_pressure > 0",
    "flow": "flow",
    "mass_flow": "mass_flow",
    "pitch": "pitch",
    "frequency": "frequency",
    "count": "ratio > 0",
    "mass": "mass",
    "voltage": "voltage > 0",
    "breakup_length": "distance",
}
_KINDS: Final[dict[str, str]] = {
    "discharge_coefficient": "ratio",
    "velocity": "velocity",
    "jet_diameter": "length",
    "contraction": "ratio",
    "drop_mass": "mass",
    "growth_rate": "growth_rate",
    "radius_amplitude_per_volt": "length",
}


@dataclass(frozen=True, slots=True)
class Calibration:
    """What a rig was found to do, with the spread between its measurements.

    Parameters
    ----------
    values : dict of str to float
        Of those in the table that the measurements decide [SI].
    spreads : dict of str to float
        Relative standard deviation of one measurement, NaN from a single one [-].
    expected : dict of str to float
        What the models give for the same [SI].
    nozzle_diameter : float
        The hole that they are for [m].
    has_units : bool
        Whether the table shows the trade's units.
    """

    values: Mapping[str, float]
    spreads: Mapping[str, float]
    expected: Mapping[str, float]
    nozzle_diameter: float
    has_units: bool = False

    def inputs(self, voltage: Any = None) -> dict[str, float]:
        """What to hand to `stream` so that it uses the rig's own values.

        Parameters
        ----------
        voltage : float or with a unit, optional
            Voltage of the drive [V].

        Returns
        -------
        dict of str to float
            ``nozzle_diameter`` and, where known, ``discharge_coefficient``, ``contraction`` and
            ``radius_amplitude`` [SI].

        Raises
        ------
        BadInput
            For a voltage without breakup lengths.
        """
        kept = {"nozzle_diameter": self.nozzle_diameter}
        for word in ("discharge_coefficient", "contraction"):
            if word in self.values:
                kept[word] = self.values[word]
        if voltage is not None:
            if "radius_amplitude_per_volt" not in self.values:
                raise BadInput(
                    "the drive was not calibrated",
                    allowed="breakup lengths at two or more voltages",
                )
            volts = units.single(voltage, "voltage", "voltage", domain="> 0")
            kept["radius_amplitude"] = self.values["radius_amplitude_per_volt"] * volts
        return kept

    def table(self) -> pd.DataFrame:
        """Found and expected values with the spread between measurements.

        Returns
        -------
        pandas.DataFrame
            One row per value; ``spread_95`` is relative, two standard deviations.

        Examples
        --------
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> print(f"{found.calibrate(count=1e6, mass='0.52 g').table()['value'].item():.0f} ng")
        520 ng
        """
        import pandas as pd

        rows = []
        for word, value in self.values.items():
            kind = _KINDS[word]
            per = kind_of(kind)[0].per_stock if self.has_units else 1.0
            rows.append(
                (word, value / per, display.unit_of(kind, with_units=self.has_units),
                 2.0 * self.spreads[word], self.expected.get(word, math.nan) / per)
            )  # fmt: skip
        columns = ["quantity", "value", "unit", "spread_95", "expected"]
        return pd.DataFrame(rows, columns=columns).set_index("quantity")


def _mean(values: Any) -> tuple[float, float]:
    """Mean, and relative standard deviation of one."""
    flat = np.ravel(values)
    mean = float(flat.mean())
    return mean, float(flat.std(ddof=1) / mean) if flat.size > 1 else math.nan


def calibrate(stream: Stream, measured: Mapping[str, Any]) -> Calibration:
    """What measurements on the rig of one stream say of it; see `Stream.calibrate`.

    Parameters
    ----------
    stream : Stream
        One design, for its liquid, its hole and what is expected.
    measured : mapping
        Of one hole: ``gauge_pressure`` with ``flow`` or ``mass_flow``; ``pitch`` with
        ``frequency``; ``count`` with ``mass``; ``voltage`` with ``breakup_length``.

    Returns
    -------
    Calibration
        Whatever these decide.

    Raises
    ------
    BadInput
        For an array of streams, half a pair, unlike numbers of points, lengths that don't fall.
    """
    if stream.shape:
        raise BadInput("this is an array of streams", allowed="one stream")
    given: dict[str, Any] = {}
    with_units = stream.has_units
    for word, value in measured.items():
        if value is None:
            continue
        kind, domain = kind_of(_MEASURED[word])
        si, asked = units.read(value, kind, word, domain=domain)
        given[word] = np.atleast_1d(np.asarray(si, dtype=float))
        with_units = with_units or asked is not None
        if np.isnan(given[word]).any():
            raise BadInput(f"{word} holds NaN", allowed="numbers")
    rho = float(np.ravel(stream._case.liquid.density)[0])
    gamma = float(np.ravel(stream._case.liquid.surface_tension)[0])
    bore = stream.value("nozzle_diameter")
    if "mass_flow" in given:
        given.setdefault("flow", given["mass_flow"] / rho)
    _paired(given)
    values: dict[str, float] = {}
    spreads: dict[str, float] = {}

    def put(word: str, found: Any) -> None:
        values[word], spreads[word] = _mean(found)

    if "pitch" in given:
        put("velocity", given["pitch"] * given["frequency"])
        if "flow" in given and "gauge_pressure" not in given:
            put(
                "jet_diameter", np.sqrt(4.0 * given["flow"].mean() / (math.pi * values["velocity"]))
            )
            put("contraction", values["jet_diameter"] / bore)
    if "gauge_pressure" in given:
        narrow = values.get("contraction", stream.value("contraction"))
        put(
            "discharge_coefficient",
            nozzle.discharge_coefficient_from_flow.si(
                rho, gamma, given["flow"], given["gauge_pressure"], bore, contraction=narrow
            ),
        )
    if "count" in given:
        put("drop_mass", given["mass"] / given["count"])
    if "voltage" in given:
        _of_drive(given, values, spreads, stream)
    if not values:
        raise BadInput(
            "nothing is given that says something of the rig",
            allowed="gauge_pressure with flow, pitch with frequency, count with mass, voltage with "
            "breakup_length",
        )
    return Calibration(values, spreads, _expected(stream, rho, gamma, bore), bore, with_units)


def _paired(given: dict[str, Any]) -> None:
    pairs = (("gauge_pressure", "flow"), ("pitch", "frequency"), ("count", "mass"),
             ("voltage", "breakup_length"))  # fmt: skip
    for one, other in pairs:
        halves = (one in given, other in given)
        if one == "gauge_pressure" and halves == (False, True) and "pitch" in given:
            continue  # a flow beside pitch and frequency gives the jet's diameter
        if halves[0] != halves[1]:
            here, away = (one, other) if halves[0] else (other, one)
            raise BadInput(f"{here} is given without {away}", allowed="both, point by point")
        if halves[0]:
            sizes = {given[one].size, given[other].size} - {1}
            if len(sizes) > 1:
                raise BadInput(
                    f"{one} has {given[one].size} points, {other} {given[other].size}",
                    allowed="as many of both",
                )


def _of_drive(
    given: dict[str, Any], values: dict[str, float], spreads: dict[str, float], stream: Stream
) -> None:
    """``L = (U/w) (ln a - ln(k V))``: growth rate from the slope, amplitude from the level."""
    logs = np.log(given["voltage"])
    if logs.size < 2 or np.ptp(logs) == 0.0:
        raise BadInput("one voltage only", allowed="breakup lengths at two or more voltages")
    lengths = np.broadcast_to(given["breakup_length"], logs.shape)
    slope, level = np.polyfit(logs, lengths, 1)
    if slope >= 0.0:
        raise BadInput(
            "the breakup length does not fall with the voltage",
            hint="Is the drive strong enough to rule, and below the length that turns back?",
        )
    speed = values.get("velocity", stream.value("velocity"))
    radius = 0.5 * values.get("jet_diameter", stream.value("jet_diameter"))
    values["growth_rate"] = float(-speed / slope)
    values["radius_amplitude_per_volt"] = float(radius * math.exp(level / slope))
    spreads["growth_rate"] = spreads["radius_amplitude_per_volt"] = math.nan
    if logs.size > 2:
        left = lengths - (slope * logs + level)
        scatter = float(np.sqrt((left @ left) / (logs.size - 2)))
        error = scatter / math.sqrt(float(((logs - logs.mean()) ** 2).sum()))
        spreads["growth_rate"] = abs(error / slope)
        spreads["radius_amplitude_per_volt"] = abs(scatter / slope)


def _expected(stream: Stream, rho: float, gamma: float, bore: float) -> dict[str, float]:
    kept = {word: stream.value(word) for word in _KINDS if word in stream.found}
    kept["discharge_coefficient"] = nozzle.discharge_coefficient_from_flow.si(
        rho, gamma, stream.value("flow"), stream.value("gauge_pressure"), bore,
        contraction=stream.value("contraction"),
    )  # fmt: skip
    return kept
