"""`Stream`: one design, or an array of them, with all that it rests on."""

from __future__ import annotations

from functools import cached_property
from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit import units
from dropkit.design import stream_report
from dropkit.design.stream_attributes import StreamAttributes
from dropkit.design.stream_case import Case
from dropkit.design.stream_criteria import Criterion
from dropkit.design.stream_given import INPUTS
from dropkit.design.stream_quantities import QUANTITIES
from dropkit.design.stream_solver import Solved
from dropkit.design.stream_studies import StreamStudies
from dropkit.errors import BadInput, UnknownName, nearest
from dropkit.properties.jsonable import from_plain, to_plain
from dropkit.properties.state import State
from dropkit.version import VERSION

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["Stream"]

HIGH_PRESSURE: Final = 7e5  # Pa; 100 psi, the usual mark for injection hazards, common practice
PIERCING: Final = (
    "high pressure: jets can pierce skin, which is always a medical emergency even where the wound "
    "looks small"
)
VIOLENT: Final = (
    "liquids that can decompose violently, as melts of ammonium nitrate and what forms peroxides, "
    "are outside what this tool supports"
)
_VIOLENT_WORDS: Final = ("ammonium nitrate", "ammonium_nitrate", "peroxide")
_MODELS: Final = ("Chandrasekhar1961", "Weber1931")
_BESIDE: Final = {"radius_amplitude", "pressure_limit", "shear_limit", "breakup_before"}


class Stream(StreamAttributes, StreamStudies):
    """A stream of drops: frozen quantities, criteria, assumptions and cautions.

    Made by `stream`. Each quantity is an attribute; one asked for with a unit gives Quantities,
    one asked for in SI gives floats and arrays. What is undetermined is NaN and listed.

    Parameters
    ----------
    state : State
        Of the liquid, in SI.
    inputs : dict of str
        What was given [SI].
    options : dict of str
        ``nozzle_kind`` and ``outside``.
    case : Case
        The core's input.
    solved : Solved
        The core's unknowns.
    found : dict of str to ndarray
        Quantities, flat.
    shape : tuple of int
        Of the designs; empty for one.
    reasons : ndarray of object
        Why a design is refused, flat; empty texts where it is not.
    assumptions : tuple of str
        Defaults that free variables took.
    asked : Asked or None
        How it was asked.
    """

    def __init__(
        self,
        state: State,
        inputs: dict[str, Any],
        options: dict[str, Any],
        case: Any,
        solved: Any,
        found: dict[str, Any],
        shape: tuple[int, ...],
        reasons: Any,
        assumptions: tuple[str, ...],
        asked: units.Asked | None,
    ) -> None:
        for array in (*found.values(), reasons):
            array.flags.writeable = False
        self.__dict__.update(
            state=state, inputs=inputs, options=options, _case=case, _solved=solved, found=found,
            shape=shape, reasons=reasons, assumptions=assumptions, asked=asked,
        )  # fmt: skip

    state: State
    inputs: dict[str, Any]
    options: dict[str, Any]
    _case: Case
    _solved: Solved
    found: dict[str, Any]
    shape: tuple[int, ...]
    reasons: Any
    assumptions: tuple[str, ...]
    asked: units.Asked | None

    def __setattr__(self, name: str, value: Any) -> None:
        raise AttributeError(f"a stream is frozen; design another one with a changed {name}")

    def __eq__(self, other: object) -> bool:
        return isinstance(other, Stream) and self.to_dict() == other.to_dict()

    __hash__ = object.__hash__

    # ------------------------------------------------ how it was asked
    @property
    def has_units(self) -> bool:
        """Whether it gives Quantities."""
        return self.asked is not None

    def si(self) -> Stream:
        """The same stream giving SI floats and arrays.

        Returns
        -------
        Stream
            What was computed is shared.

        Examples
        --------
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> round(found.si().velocity, 2)
        4.84
        """
        return self._turned(None)

    def with_units(self) -> Stream:
        """The same stream giving Quantities.

        Returns
        -------
        Stream
            What was computed is shared.

        Examples
        --------
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> print(f"{found.si().with_units().velocity:.2f}")
        4.84 meter / second
        """
        return self._turned(self.asked or units.Asked())

    def _turned(self, asked: units.Asked | None) -> Stream:
        return Stream(
            self.state, self.inputs, self.options, self._case, self._solved, self.found,
            self.shape, self.reasons, self.assumptions, asked,
        )  # fmt: skip

    # ------------------------------------------------ values
    def shaped(self, flat: Any) -> Any:
        """A flat array of the core in the shape of the designs.

        Parameters
        ----------
        flat : ndarray
            One element per design.

        Returns
        -------
        float, str or ndarray
            A float or text for one design.
        """
        array = np.broadcast_to(flat, (self._case.n,)).reshape(self.shape)
        return array if self.shape else array.item()

    def value(self, word: str) -> Any:
        """A quantity in SI.

        Parameters
        ----------
        word : str
            Such as ``"drop_diameter"``.

        Returns
        -------
        float or ndarray
            NaN where undetermined or refused.

        Raises
        ------
        UnknownName
            No quantity is called so.
        """
        if word not in self.found:
            raise UnknownName(
                f"a stream has no {word!r}", allowed=", ".join(QUANTITIES),
                choices=nearest(word, QUANTITIES),
            )  # fmt: skip
        return self.shaped(self.found[word])

    def _quantity(self, word: str) -> Any:
        return units.give(self.value(word), QUANTITIES[word][0], self.asked)

    def origin(self, word: str) -> str:
        """Whether a quantity was given, follows, or is undetermined.

        Parameters
        ----------
        word : str
            Such as ``"drop_diameter"``.

        Returns
        -------
        str
            ``"given"``, ``"follows"`` or ``"undetermined"``.
        """
        if word in self.inputs:
            return "given"
        return "undetermined" if np.isnan(self.found[word]).all() else "follows"

    @property
    def undetermined(self) -> tuple[str, ...]:
        """Quantities that the given ones leave open."""
        return tuple(
            word for word, value in self.found.items()
            if np.isnan(value).all() and word not in _BESIDE
            and not word.startswith("breakup_length_")
        )  # fmt: skip

    @property
    def reason(self) -> Any:
        """Why a design is refused, empty where it is not; an array of text for arrays."""
        return self.shaped(self.reasons)

    # ------------------------------------------------ judgement
    @cached_property
    def judged(self) -> tuple[Criterion, ...]:
        """The criteria, flat arrays in SI."""
        return self._case.criteria(self.found)

    def criteria(self) -> pd.DataFrame:
        """Every criterion with value, limits, margin, verdict, source and note.

        Returns
        -------
        pandas.DataFrame
            Indexed by criterion; `margin` is the distance to the limit over the limit, negative
            beyond; `met` is 1, 0, 0.5 where doubtful, NaN where undetermined or without a limit.
        """
        return stream_report.criteria_frame(self)

    @property
    def margin(self) -> Any:
        """The smallest margin of the criteria that rule a stream out [-], NaN where unknown."""
        rows = [each.margin for each in self.judged if each.name in RULING]
        with np.errstate(all="ignore"):
            least = np.fmin.reduce([np.broadcast_to(row, (self._case.n,)) for row in rows])
        return self.shaped(np.where(self.reasons == "", least, np.nan))

    @property
    def feasible(self) -> Any:
        """Whether no design is refused and no criterion failed; True, False, or an array."""
        good = self.reasons == ""
        for each in self.judged:
            good = good & ~(np.asarray(each.met) == 0.0)
        return self.shaped(good)

    # ------------------------------------------------ what it rests on
    @property
    def cautions(self) -> tuple[str, ...]:
        """What to know before use: of the pressure, and of the liquid."""
        texts = list(self.state.cautions)
        with np.errstate(all="ignore"):
            if np.nanmax(np.append(self.found["gauge_pressure"], 0.0)) >= HIGH_PRESSURE:
                texts.insert(0, PIERCING)
        told = " ".join([self.state.name, *texts]).casefold()
        if any(word in told for word in _VIOLENT_WORDS):
            texts.insert(0, VIOLENT)
        return tuple(texts)

    @property
    def sources(self) -> tuple[str, ...]:
        """Keys of the sources of properties, models and criteria."""
        keys = [key for each in self.judged for key in each.source.split(", ") if key != "yours"]
        keys = [key for key in keys if " " not in key]
        return tuple(dict.fromkeys([*self.state.sources, *_MODELS, *self._case.hole.kind.sources,
                                    *keys]))  # fmt: skip

    # ------------------------------------------------ tables, dicts, display
    def table(self) -> pd.DataFrame:
        """Every quantity with value, unit, origin and meaning.

        Returns
        -------
        pandas.DataFrame
            Indexed by quantity; for arrays the value column holds one array per row.

        Examples
        --------
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> found.table().loc["velocity", "unit"]
        'm/s'
        """
        return stream_report.quantity_frame(self)

    def frame(self) -> pd.DataFrame:
        """One row per design: quantities in SI, whether it is feasible, margin and reason.

        Returns
        -------
        pandas.DataFrame
            In the flat order of the arrays.
        """
        import pandas as pd

        columns = {word: value for word, value in self.found.items()}
        extra = {"feasible": np.ravel(self.feasible), "margin": np.ravel(self.margin),
                 "reason": self.reasons}  # fmt: skip
        return pd.DataFrame({**columns, **extra})

    def report(self) -> str:
        """Inputs, assumptions, liquid, quantities, criteria, cautions and sources as text.

        Returns
        -------
        str
            To print or file.
        """
        return stream_report.report(self)

    def to_dict(self) -> dict[str, Any]:
        """A dict of plain types that survives JSON; `from_dict` rebuilds the stream.

        Returns
        -------
        dict
            State, inputs, quantities [SI], criteria, assumptions, cautions.

        Examples
        --------
        >>> from dropkit.design import stream
        >>> found = stream("water", "20 degC", drop_diameter="100 um", frequency="20 kHz")
        >>> type(found).from_dict(found.to_dict()) == found
        True
        """
        judged = [
            {
                "name": each.name, "kind": each.kind, "value": to_plain(self._np(each.value)),
                "low": to_plain(self._np(each.low)), "high": to_plain(self._np(each.high)),
                "margin": to_plain(self._np(each.margin)), "met": to_plain(self._np(each.met)),
                "verdict": np.asarray(self.shaped(each.verdict)).tolist(), "source": each.source,
                "note": each.note,
            }
            for each in self.judged
        ]  # fmt: skip
        return {
            "kind": "Stream",
            "version": VERSION,
            "state": self.state.to_dict(),
            "inputs": {word: to_plain(value) for word, value in self.inputs.items()},
            "options": dict(self.options),
            "with_units": self.has_units,
            "quantities": {word: to_plain(self._np(value)) for word, value in self.found.items()},
            "criteria": judged,
            "reasons": np.asarray(self.reason).tolist(),
            "assumptions": list(self.assumptions),
            "cautions": list(self.cautions),
        }

    def _np(self, flat: Any) -> Any:
        return self.shaped(np.asarray(flat, dtype=float))

    @classmethod
    def from_dict(cls, data: dict[str, Any]) -> Stream:
        """Design the stream again from `to_dict`: the same state and inputs give the same stream.

        Parameters
        ----------
        data : dict
            What `to_dict` gave, also after a passage through JSON.

        Returns
        -------
        Stream
            In SI or with units, as it was.

        Raises
        ------
        BadInput
            The dict of something else.
        """
        from dropkit.design.stream_design import designed

        needed = {"state", "inputs", "options", "with_units"}
        if not isinstance(data, dict) or data.get("kind") != "Stream" or not needed <= data.keys():
            raise BadInput("This is no dict of a Stream", allowed="what Stream.to_dict() gave")
        inputs = {word: from_plain(value) for word, value in data["inputs"].items()}
        if not inputs.keys() <= INPUTS.keys():
            raise BadInput("This dict holds inputs that no stream takes")
        asked = units.Asked() if data["with_units"] else None
        return designed(State.from_dict(data["state"]), inputs, data["options"], asked)

    def __repr__(self) -> str:
        return stream_report.text(self)

    def _repr_html_(self) -> str:
        return stream_report.html(self)


RULING: Final = ("jetting", "grows", "wavelength", "regime", "laminar", "boiling", "cavitation",
                 "pressure", "wall shear", "breakup")  # fmt: skip
