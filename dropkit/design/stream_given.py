"""Reads what a stream is asked with: units, one fact per word, what agrees and what does not."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from typing import Any, Final

import numpy as np

from dropkit import units
from dropkit.design.stream_quantities import Drive
from dropkit.errors import BadInput
from dropkit.unit_table import kind_of

__all__ = ["AGREE", "INPUTS", "Given", "facts_of", "read_inputs"]

# Input -> kind and domain.
INPUTS: Final[dict[str, str]] = {
    "drop_diameter": "length",
    "drop_volume": "volume",
    "frequency": "frequency",
    "drop_rate": "frequency",
    "velocity": "velocity > 0",
    "flow": "flow",
    "total_flow": "flow",
    "mass_flow": "mass_flow",
    "gauge_pressure": "gauge_pressure > 0",
    "nozzle_diameter": "length",
    "nozzle_length": "length > 0",
    "jet_diameter": "length",
    "wavelength_ratio": "ratio > 0",
    "holes": "ratio > 0",
    "contraction": "ratio > 0",
    "discharge_coefficient": "ratio > 0",
    "entry_loss": "ratio >= 0",
    "radius_amplitude": "length > 0",
    "velocity_amplitude": "velocity > 0",
    "pressure_amplitude": "pressure > 0",
    "pressure_limit": "gauge_pressure > 0",
    "shear_limit": "shear_rate > 0",
    "breakup_before": "distance",
    "share": "fraction",
    "gas_density": "density",
    "ambient_pressure": "absolute_pressure",
}
AMPLITUDES: Final = ("radius_amplitude", "velocity_amplitude", "pressure_amplitude")
AGREE: Final = 0.01
"""Largest relative difference at which two given quantities count as the same, rounded ones."""

# Words that state the same fact.
_TWINS: Final = (
    ("drop_volume", "drop_diameter"),
    ("frequency", "drop_rate"),
    ("flow", "total_flow", "mass_flow"),
)


@dataclass(frozen=True, slots=True)
class Given:
    """The facts of one call, per hole.

    Parameters
    ----------
    facts : dict of str
        Word of the solver to value [SI].
    words : dict of str to str
        Which input each fact came from.
    checks : tuple of (str, str, value)
        Further inputs: the word, the fact that it states, and its value for that fact.
    holes : float or array
        Number of holes.
    assumptions : tuple of str
        What was taken for granted.
    """

    facts: dict[str, Any]
    words: dict[str, str]
    checks: tuple[tuple[str, str, Any], ...]
    holes: Any
    assumptions: tuple[str, ...]


def read_inputs(
    given: Mapping[str, Any], plausible: bool
) -> tuple[dict[str, Any], units.Asked | None]:
    """Inputs in SI without those that are None, and how they were asked.

    Parameters
    ----------
    given : mapping
        Words of `INPUTS`.
    plausible : bool
        Whether values that no device has are refused.

    Returns
    -------
    inputs : dict of str
        Floats and arrays [SI].
    asked : Asked or None
        Of the first input with a unit.
    """
    inputs: dict[str, Any] = {}
    asked: units.Asked | None = None
    for word, value in given.items():
        if value is None:
            continue
        kind, domain = kind_of(INPUTS[word])
        # The window of densities is that of liquids.
        judged = plausible and word != "gas_density"
        si, its = units.read(value, kind, word, domain=domain, plausible=judged)
        if its is not None and (asked is None or asked.registry is None):
            asked = its
        inputs[word] = si if isinstance(si, (float, np.ndarray)) else si.to_numpy()
    holes = inputs.get("holes")
    if holes is not None and np.any(np.abs(holes - np.round(holes)) > 1e-9):
        raise BadInput("holes is no whole number", allowed="1, 2, 3 and so on")
    return inputs, asked


def _fact(word: str, value: Any, holes: Any, density: Any) -> Any:
    """What an input says of one hole."""
    if word == "drop_diameter":
        return np.pi / 6.0 * value * value * value
    if word in ("drop_rate", "total_flow"):
        return value / holes
    if word == "mass_flow":
        return value / (density * holes)
    return value


def _counted(inputs: Mapping[str, Any], density: Any) -> Any:
    """Number of holes that two given flows or rates imply; None without them."""
    pairs = []
    if "flow" in inputs and "total_flow" in inputs:
        pairs.append(inputs["total_flow"] / inputs["flow"])
    if "flow" in inputs and "mass_flow" in inputs:
        pairs.append(inputs["mass_flow"] / density / inputs["flow"])
    if "frequency" in inputs and "drop_rate" in inputs:
        pairs.append(inputs["drop_rate"] / inputs["frequency"])
    for ratio in pairs:
        whole = np.maximum(np.round(ratio), 1.0)
        if np.all(np.abs(ratio / whole - 1.0) < AGREE):
            return whole
    return None


def facts_of(inputs: Mapping[str, Any], density: Any) -> Given:
    """Facts of one hole from the inputs; of inputs that state the same fact one decides.

    Parameters
    ----------
    inputs : mapping
        From `read_inputs`.
    density : float or array
        Of the liquid [kg/m3].

    Returns
    -------
    Given
        With the number of holes.
    """
    notes = []
    holes = inputs.get("holes")
    if holes is None:
        holes = _counted(inputs, density)
        if holes is None:
            holes = 1.0
            notes.append("holes: one")
        else:
            notes.append("holes: counted from the flow or rate of one hole and of all")
    facts: dict[str, Any] = {}
    words: dict[str, str] = {}
    checks = []
    for group in (*_TWINS, ("velocity",), ("jet_diameter",), ("wavelength_ratio",),
                  ("nozzle_diameter",), ("gauge_pressure",)):  # fmt: skip
        for word in group:
            if word not in inputs:
                continue
            value = _fact(word, inputs[word], holes, density)
            if group[0] in facts:
                checks.append((word, group[0], value))
            else:
                facts[group[0]], words[group[0]] = value, word
    return Given(facts, words, tuple(checks), holes, tuple(notes))


def drive_of(inputs: Mapping[str, Any]) -> Drive:
    """The drive's amplitude; at most one of the three."""
    found = [word for word in AMPLITUDES if word in inputs]
    if len(found) > 1:
        raise BadInput(
            f"{' and '.join(found)} are both given",
            allowed="one amplitude: of the radius, the speed, or the pressure",
            hint="The three mean different things; one per cent of each is not the same drive",
        )
    return Drive(found[0], inputs[found[0]]) if found else Drive()
