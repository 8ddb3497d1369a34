"""What happens to a designed stream when its rig, its liquid or its temperature changes.

A rig is what stands on the bench: its pressure (or its pump's flow), its holes and its drive's
frequency stay, and the drops follow. Every study is one call of the array core.
"""

from __future__ import annotations

from dataclasses import replace
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit import units
from dropkit.design.stream_calibration import Calibration, calibrate
from dropkit.design.stream_case import Case
from dropkit.design.stream_quantities import QUANTITIES
from dropkit.design.stream_solver import Liquid
from dropkit.errors import BadInput
from dropkit.properties import display

if TYPE_CHECKING:
    import pandas as pd

    from dropkit.design.stream_result import Stream

__all__ = ["RESPONSES", "StreamStudies", "rig_of"]

RESPONSES: Final = ("drop_diameter", "velocity", "breakup_length", "jet_diameter", "flow",
                    "wavelength_ratio")  # fmt: skip
_STEP: Final = 1e-3  # relative; central differences are then good to about 1e-6
_HOLD: Final = {"pressure": "gauge_pressure", "flow": "flow"}


def rig_of(stream: Stream, hold: str = "pressure") -> Case:
    """The case of a rig that is built: hole, drive and pressure (or flow) fixed.

    Parameters
    ----------
    stream : Stream
        A complete design.
    hold : {"pressure", "flow"}
        What the supply keeps.

    Returns
    -------
    Case
        With the same answer as the stream.

    Raises
    ------
    BadInput
        For another word, and for a stream that is not determined.
    """
    if hold not in _HOLD:
        raise BadInput(f"hold={hold!r} is not known", allowed="'pressure' or 'flow'")
    if any(np.isnan(stream.found[word]).all() for word in ("velocity", "frequency", "flow")):
        raise BadInput(
            f"this stream is not determined: {', '.join(stream.undetermined[:6])} are open",
            allowed="a stream with two or three independent facts",
        )
    words = ("nozzle_diameter", "frequency", _HOLD[hold])
    case = stream._case
    hole = replace(case.hole, length=stream.found["nozzle_length"])
    return replace(case, facts={word: stream.found[word] for word in words}, hole=hole, words={})


def _perturbed(case: Case, factors: dict[str, Any], count: int) -> Case:
    """The case `count` times over, each input times its factors, an array of count per input."""

    def tiled(value: Any, word: str) -> Any:
        if value is None:
            return None
        many = np.broadcast_to(value, (case.n,)) * np.reshape(factors.get(word, 1.0), (-1, 1))
        return np.broadcast_to(many, (count, case.n)).ravel()

    liquid = Liquid(*(tiled(getattr(case.liquid, word), word) for word in Liquid.__slots__))
    hole = replace(
        case.hole,
        length=tiled(case.hole.length, "nozzle_length"),
        length_ratio=tiled(case.hole.length_ratio, ""),
        contraction=tiled(case.hole.contraction, "contraction"),
        entry_loss=tiled(case.hole.entry_loss, ""),
        discharge_coefficient=tiled(case.hole.discharge_coefficient, "discharge_coefficient"),
    )
    limits = replace(case.limits, gas_density=tiled(case.limits.gas_density, ""))
    return replace(
        case,
        liquid=liquid,
        hole=hole,
        facts={word: tiled(value, word) for word, value in case.facts.items()},
        holes=tiled(case.holes, ""),
        limits=limits,
        drive=replace(case.drive, value=tiled(case.drive.value, case.drive.word)),
        n=count * case.n,
    )


class StreamStudies:
    """Studies of a stream; `Stream` has them as methods."""

    def sensitivities(self: Any, *, hold: str = "pressure") -> pd.DataFrame:
        """Per cent of change of the drops for one per cent of each input of the rig.

        Parameters
        ----------
        hold : {"pressure", "flow"}
            What the supply keeps: a pressure, or a pump's flow.

        Returns
        -------
        pandas.DataFrame
            Inputs by responses [-]; for an array of designs each cell is the median.

        Raises
        ------
        BadInput
            For a stream that is not determined.

        Examples
        --------
        >>> import dropkit as dk
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> float(round(found.sensitivities(hold="flow").loc["frequency", "drop_diameter"], 3))
        -0.333
        """
        import pandas as pd

        case = rig_of(self, hold)
        words = [*case.facts, "nozzle_length", *Liquid.__slots__]
        words += [self._case.drive.word] if self._case.drive.word else []
        for word in ("contraction", "discharge_coefficient"):
            words += [word] if getattr(case.hole, word) is not None else []
        count = 2 * len(words)
        factors = {}
        for i, word in enumerate(words):
            factors[word] = np.ones(count)
            factors[word][2 * i : 2 * i + 2] = 1.0 + _STEP, 1.0 - _STEP
        many = _perturbed(case, factors, count)
        found = many.quantities(many.solve())
        span = np.log((1.0 + _STEP) / (1.0 - _STEP))
        table = {}
        with np.errstate(all="ignore"):
            for response in RESPONSES:
                logs = np.log(found[response]).reshape(count, case.n)
                each = (logs[0::2] - logs[1::2]) / span
                table[response] = each[:, 0] if case.n == 1 else np.nanmedian(each, axis=1)
        return pd.DataFrame(table, index=pd.Index(words, name="input"))

    def tolerance(
        self: Any,
        *,
        hole: Any = 1e-6,
        between: float = 0.05,
        hold: str = "pressure",
    ) -> pd.DataFrame:
        """What an error of the hole, and differences between holes, do to the drops.

        Parameters
        ----------
        hole : float or with a unit
            Error of the hole's diameter either way [m].
        between : float
            Relative difference of diameter between holes either way [-].
        hold : {"pressure", "flow"}
            What the supply keeps.

        Returns
        -------
        pandas.DataFrame
            One row per change; responses relative to the design [-], of one stream.

        Raises
        ------
        BadInput
            For a stream that is not determined, and for an array of streams.

        Examples
        --------
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> float(round(found.tolerance().loc["hole +5 %", "flow"], 2))
        0.14
        """
        import pandas as pd

        if self.shape:
            raise BadInput("this is an array of streams", allowed="one stream")
        step = units.single(hole, "length", "hole")
        bore = float(self.found["nozzle_diameter"].item())
        if not 0.0 < between < 1.0 or step >= bore:
            raise BadInput(
                "the change is as large as the hole", allowed="changes below the hole's diameter"
            )
        named = {
            f"hole +{step * 1e6:g} um": 1.0 + step / bore,
            f"hole -{step * 1e6:g} um": 1.0 - step / bore,
            f"hole +{100 * between:g} %": 1.0 + between,
            f"hole -{100 * between:g} %": 1.0 - between,
        }
        case = rig_of(self, hold)
        many = _perturbed(case, {"nozzle_diameter": np.array([*named.values()])}, len(named))
        found = many.quantities(many.solve())
        table = {word: found[word] / self.found[word] - 1.0 for word in RESPONSES}
        return pd.DataFrame(table, index=pd.Index([*named], name="change"))

    def drift(self: Any, temperature: Any, *, fluid: Any = None, hold: str = "pressure") -> Stream:
        """The same rig over a window of temperature, or with another or drifting composition.

        Parameters
        ----------
        temperature : array or with a unit
            Temperatures [K].
        fluid : Fluid, optional
            Another liquid, or a mixture whose composition is an array; by default the same one.
        hold : {"pressure", "flow"}
            What the supply keeps.

        Returns
        -------
        Stream
            An array of streams, refused ones NaN with their reason.

        Raises
        ------
        BadInput
            For a stream that is not determined, an array, or one that has lost its fluid.

        Examples
        --------
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> window = found.drift((range(10, 31, 10), "degC"))
        >>> print(", ".join(f"{speed:.2f}" for speed in window.si().velocity))
        4.30, 4.84, 5.27
        """
        from dropkit.design.stream_design import designed

        if self.shape:
            raise BadInput("this is an array of streams", allowed="one stream")
        rig_of(self, hold)
        its = fluid if fluid is not None else self.state._fluid
        if its is None:
            raise BadInput(
                "this stream has numbers at one temperature only, no liquid",
                allowed="fluid=... names the liquid or mixture",
            )
        state = its.at(temperature, outside="nan")
        asked = state._asked or self.asked
        return designed(state.si(), _bench(self, hold), {**self.options, "outside": "nan"}, asked)

    def alternatives(self: Any, nozzle_diameters: Any) -> pd.DataFrame:
        """Stocked holes that make the same drops at the same rate, best margin first.

        Parameters
        ----------
        nozzle_diameters : array or with a unit
            Diameters in stock [m].

        Returns
        -------
        pandas.DataFrame
            One row per hole: what it takes, whether it is feasible, its smallest margin, and the
            reason where it is refused; units as the stream was asked.

        Raises
        ------
        BadInput
            For a stream that is not determined, and for an array.

        Examples
        --------
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> stock = found.alternatives((range(40, 81, 10), "um"))
        >>> float(stock["nozzle_diameter [um]"].iloc[0])
        60.0
        """
        import pandas as pd

        from dropkit.design.stream_design import designed

        if self.shape:
            raise BadInput("this is an array of streams", allowed="one stream")
        stock, asked = units.read(nozzle_diameters, "length", "nozzle_diameters")
        inputs = _bench(self, "pressure")
        for word in ("gauge_pressure", "nozzle_length"):
            inputs.pop(word, None)
        if "nozzle_length" in self.inputs:
            inputs["nozzle_length"] = self.inputs["nozzle_length"]
        inputs["drop_diameter"] = self.value("drop_diameter")
        inputs["nozzle_diameter"] = np.atleast_1d(stock)
        found = designed(self.state.si(), inputs, {**self.options, "outside": "nan"}, None)
        shown = asked is not None or self.has_units
        table = {}
        for word in ("nozzle_diameter", "gauge_pressure", "velocity", "wavelength_ratio",
                     "drop_ratio", "breakup_length"):  # fmt: skip
            kind = QUANTITIES[word][0]
            value = inputs[word] if word in inputs else found.found[word]
            sign = display.unit_of(kind, with_units=shown)
            head = word if sign == "-" else f"{word} [{sign}]"
            table[head] = display.in_stock(kind, value) if shown else value
        table["feasible"] = np.ravel(found.feasible)
        table["margin"] = np.ravel(found.margin)
        table["reason"] = found.reasons
        frame = pd.DataFrame(table)
        return frame.sort_values(["feasible", "margin"], ascending=False, ignore_index=True)

    def calibrate(
        self: Any,
        *,
        gauge_pressure: Any = None,
        flow: Any = None,
        mass_flow: Any = None,
        pitch: Any = None,
        frequency: Any = None,
        count: Any = None,
        mass: Any = None,
        voltage: Any = None,
        breakup_length: Any = None,
    ) -> Calibration:
        """What measurements on one hole of the rig say of it.

        Parameters
        ----------
        gauge_pressure, flow, mass_flow : float, array or with a unit
            Pressures [Pa] with the flows [m3/s] or weighed flows [kg/s]: the discharge coefficient.
        pitch, frequency : float, array or with a unit
            Strobed distance between drops [m] with the drive's frequency [Hz]: the jet's speed;
            with one flow beside them, and no pressure, its diameter and the contraction.
        count, mass : float, array or with a unit
            Counted drops and what they weigh [kg]: the mass of one.
        voltage, breakup_length : array or with a unit
            Two or more voltages of the drive [V] with breakup lengths [m]: the growth rate, and
            the amplitude of the radius per volt.

        Returns
        -------
        Calibration
            Its `inputs` go to `stream`, which then predicts with the rig's own values.

        Raises
        ------
        BadInput
            For half a pair, one voltage only, and an array of streams.

        Examples
        --------
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> rig = found.calibrate(gauge_pressure="0.45 bar", mass_flow="0.63 g/min")
        >>> print(f"{rig.values['discharge_coefficient']:.3f}")
        0.401
        """
        given = dict(
            gauge_pressure=gauge_pressure, flow=flow, mass_flow=mass_flow, pitch=pitch,
            frequency=frequency, count=count, mass=mass, voltage=voltage,
            breakup_length=breakup_length,
        )  # fmt: skip
        return calibrate(self, given)


def _bench(stream: Stream, hold: str) -> dict[str, Any]:
    """The inputs that set up the same rig once more."""
    kept = {
        word: value
        for word, value in stream.inputs.items()
        if word
        in (
            "holes", "contraction", "discharge_coefficient", "entry_loss", "radius_amplitude",
            "velocity_amplitude", "pressure_amplitude", "pressure_limit", "shear_limit",
            "breakup_before", "share", "gas_density", "ambient_pressure",
        )
    }  # fmt: skip
    if {"jet_diameter", "nozzle_diameter"} <= stream.inputs.keys():
        kept["contraction"] = stream.value("contraction")
    for word in ("nozzle_diameter", "nozzle_length", "frequency", _HOLD[hold]):
        kept[word] = stream.value(word)
    return kept
