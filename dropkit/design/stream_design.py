"""`stream`: from wanted drops to nozzle, pressure and drive, and back."""

from __future__ import annotations

from collections.abc import Mapping
from typing import Any, Final

import numpy as np

from dropkit import units
from dropkit.design.stream_case import Case, Refusal
from dropkit.design.stream_criteria import Limits
from dropkit.design.stream_given import INPUTS, drive_of, facts_of, read_inputs
from dropkit.design.stream_hole import Hole, hole_kind
from dropkit.design.stream_result import Stream
from dropkit.design.stream_solver import FACTS, Liquid, choose
from dropkit.errors import BadInput, OutOfRange, RangeWarning, UnknownName, nearest, warn_user
from dropkit.properties.interface import Fluid
from dropkit.properties.pure import liquid as liquid_named
from dropkit.properties.state import State
from dropkit.validity import Outside, check_outside

__all__ = ["designed", "state_of", "stream"]

GAS_DENSITY: Final = 1.2
AMBIENT: Final = 101325.0


def stream(
    fluid: Fluid | State | str,
    temperature: Any = None,
    *,
    nozzle_kind: str = "tube",
    outside: Outside = "raise",
    plausible: bool = True,
    **given: Any,
) -> Stream:
    """Design a stream of drops from any sufficient set of its quantities.

    Holds for one round jet per hole of a Newtonian liquid in still gas, with one drop for each
    wave. Three independent facts decide; where two are given, the wave is the most unstable one.

    Parameters
    ----------
    fluid : Fluid, State or str
        What is jetted: a liquid, mixture or fluid of one's own, its state, or a liquid's name.
    temperature : float, array or with a unit, optional
        Temperature in the nozzle [K]; not beside a state, which has one.
    nozzle_kind : {"tube", "hole", "plate"}, keyword-only
        A tube, a drilled hole of 1.5 to 10 diameters, a plate thinner than half a diameter.
    outside : {"raise", "warn", "nan", "allow"}, keyword-only
        What happens to designs that are impossible or contradictory.
    plausible : bool, keyword-only
        Whether sizes that no device has are refused, with the likely slip named.
    **given : float, array or with a unit
        Of the drop: ``drop_diameter`` or ``drop_volume``; ``frequency`` of one hole or
        ``drop_rate`` of all. Of the jet: ``velocity``, ``jet_diameter``, ``flow`` of one hole,
        ``total_flow`` or ``mass_flow`` of all, ``wavelength_ratio``. Of the nozzle:
        ``nozzle_diameter``, ``nozzle_length``, ``holes``, ``gauge_pressure``, and where the rig
        was measured ``contraction``, ``discharge_coefficient``, ``entry_loss``. Of the drive:
        ``radius_amplitude``, ``velocity_amplitude`` or ``pressure_amplitude``. Limits:
        ``pressure_limit``, ``shear_limit``, ``breakup_before``, ``share`` of the maximum growth.
        Surroundings: ``gas_density``, ``ambient_pressure``.

    Returns
    -------
    Stream
        Every quantity, every criterion, assumptions and cautions.

    Raises
    ------
    UnknownName
        For a word that is none of these.
    BadInput
        For contradictory inputs, and shapes that do not broadcast.
    OutOfRange
        For what no jet does: beyond cut-off, a pressure that drives nothing, a liquid that
        flashes; unless `outside` says otherwise.
    MissingProperty
        For a fluid without density, viscosity or surface tension.

    Examples
    --------
    >>> import dropkit as dk
    >>> from dropkit.design import stream
    >>> ink = dk.mixture({"glycerol": 0.38, "water": "rest"}, by="mass")
    >>> found = stream(ink, "32 degC", drop_diameter="110 um", frequency="64 kHz")
    >>> print(f"{found.jet_diameter:.1f}, {found.velocity:.1f}")
    57.2 micrometer, 17.4 meter / second
    """
    check_outside(outside)
    unknown = [word for word in given if word not in INPUTS]
    if unknown:
        raise UnknownName(
            f"stream knows no {unknown[0]!r}",
            allowed=", ".join(INPUTS),
            choices=nearest(unknown[0], INPUTS),
        )
    inputs, asked = read_inputs(given, plausible)
    state = state_of(fluid, temperature, outside)
    if state._asked is not None and (asked is None or asked.registry is None):
        asked = state._asked
    return designed(state.si(), inputs, {"nozzle_kind": nozzle_kind, "outside": outside}, asked)


def state_of(fluid: Any, temperature: Any, outside: Outside) -> State:
    """The state of what is jetted.

    Parameters
    ----------
    fluid : Fluid, State or str
        As `stream` takes it.
    temperature : float, array or with a unit
        None beside a state.
    outside : str
        The range policy.

    Returns
    -------
    State
        As it was asked.
    """
    if isinstance(fluid, State):
        if temperature is not None:
            raise BadInput(
                "a state has its temperature already", allowed="a fluid with a temperature"
            )
        return fluid
    if isinstance(fluid, str):
        fluid = liquid_named(fluid)
    if not isinstance(fluid, Fluid):
        raise BadInput(
            f"a {type(fluid).__name__} is no liquid",
            allowed="a liquid, a mixture, a fluid of your own, a state, or a liquid's name",
        )
    if temperature is None:
        raise BadInput("the temperature is missing", allowed='such as "25 degC"')
    return fluid.at(temperature, outside=outside)


def _vapour(state: State) -> Any:
    """Vapour pressure where it is known, else None."""
    if "vapour_pressure" not in state.available():
        return None
    try:
        return state.vapour_pressure
    except (ValueError, LookupError):
        return None


def designed(
    state: State,
    inputs: Mapping[str, Any],
    options: Mapping[str, Any],
    asked: units.Asked | None,
    shape: tuple[int, ...] = (),
) -> Stream:
    """The stream of a state [SI] and inputs [SI]: what `stream` does once units are read.

    Parameters
    ----------
    state : State
        In SI.
    inputs : mapping
        Words of `INPUTS` to floats or arrays [SI].
    options : mapping
        ``nozzle_kind`` and ``outside``.
    asked : Asked or None
        How results are wanted.
    shape : tuple of int
        That the designs have at least.

    Returns
    -------
    Stream
        As `stream` gives it.
    """
    kind = hole_kind(options["nozzle_kind"])
    liquid = [state.density, state.viscosity, state.surface_tension]
    vapour = _vapour(state)
    parts = {**inputs, "temperature": state.temperature}
    try:
        shape = np.broadcast_shapes(shape, *(np.shape(part) for part in (*parts.values(), *liquid)))
    except ValueError:
        listed = ", ".join(f"{word} {np.shape(part)}" for word, part in parts.items())
        raise BadInput(
            f"stream: the shapes do not broadcast: {listed}",
            allowed="equal shapes, or lengths of 1 by numpy's rules",
            hint="For every combination add an axis, such as frequency[:, None]",
        ) from None

    def flat(part: Any) -> Any:
        return np.broadcast_to(part, shape).ravel() if np.ndim(part) else part

    its = {word: flat(part) for word, part in inputs.items()}
    three = Liquid(*(flat(part) for part in liquid))
    given = facts_of(its, three.density)
    facts, notes = dict(given.facts), list(given.assumptions)
    contraction = its.get("contraction")
    if contraction is None and {"jet_diameter", "nozzle_diameter"} <= facts.keys():
        contraction = facts["jet_diameter"] / facts["nozzle_diameter"]
        _check_contraction(contraction)
        notes.append("contraction: given jet over given hole diameter")
    length = its.get("nozzle_length")
    if length is None:
        notes.append(f"nozzle_length: {kind.length_ratio:g} diameters")
    if "entry_loss" not in its and kind.name == "tube":
        notes.append("entry_loss: 0.5, a sharp edge")
    if kind.name == "tube" and options["nozzle_kind"] == "tube":
        notes.append(f"nozzle_kind: {kind.words}")
    hole = Hole(
        kind,
        length=length,
        length_ratio=kind.length_ratio,
        contraction=contraction,
        entry_loss=its.get("entry_loss", 0.5),
        discharge_coefficient=its.get("discharge_coefficient"),
    )
    if "gas_density" not in its:
        notes.append("gas_density: 1.2 kg/m3, air at room temperature")
    if "ambient_pressure" not in its:
        notes.append("ambient_pressure: 101325 Pa")
    limits = Limits(
        pressure=its.get("pressure_limit"),
        shear_rate=its.get("shear_limit"),
        distance=its.get("breakup_before"),
        share=its.get("share", 0.8),
        ambient_pressure=its.get("ambient_pressure", AMBIENT),
        vapour_pressure=None if vapour is None else flat(vapour),
        gas_density=its.get("gas_density", GAS_DENSITY),
    )
    drive = drive_of(its)
    if not drive.word:
        notes.append("drive: no amplitude given; the breakup length is that of an undriven jet")
    if "most_unstable" in choose(frozenset(facts)):
        notes.insert(0, "wavelength_ratio: the most unstable wave, full viscous relation")
    if not facts:
        raise BadInput(
            "nothing is given that decides a stream",
            allowed=f"two or three of {', '.join(FACTS)}",
        )
    n = int(np.prod(shape, dtype=int))
    case = Case(three, facts, hole, given.holes, limits, drive, n, given.words)
    solved = case.solve()
    found = case.quantities(solved)
    for word in given.words.values():  # what was given stays as it was, to the last digit
        if word in found:
            found[word] = np.array(np.broadcast_to(its[word], (n,)), dtype=float)
    with np.errstate(all="ignore"):
        refusals = case.refusals(solved, found, given.checks)
    reasons = _policy(refusals, options["outside"], n)
    if options["outside"] == "nan":
        bad = reasons != ""
        found = {word: np.where(bad, np.nan, value) for word, value in found.items()}
    return Stream(
        state=state,
        inputs=dict(inputs),
        options=dict(options),
        case=case,
        solved=solved,
        found=found,
        shape=shape,
        reasons=reasons,
        assumptions=tuple(notes),
        asked=asked,
    )


def _check_contraction(contraction: Any) -> None:
    """A jet twice as wide or half as wide as its hole is a radius for a diameter."""
    known = np.ravel(contraction)[np.isfinite(np.ravel(contraction))]
    if known.size == 0:
        return
    low, high = float(known.min()), float(known.max())
    if low < 0.6 or high > 1.6:
        worst = low if low < 0.6 else high
        hint = ""
        if 0.35 < worst < 0.6:
            hint = "A radius of the jet given for its diameter?"
        elif 1.6 < worst < 2.4:
            hint = "A radius of the hole given for its diameter?"
        raise BadInput(
            f"jet_diameter is {worst:.3g} times nozzle_diameter",
            allowed="0.6 to 1.6 times: jets contract to 0.78 to 1 of the hole, slow ones swell to 1.13",
            hint=hint,
        )


def _policy(refusals: list[Refusal], outside: str, n: int) -> Any:
    """The reason of each design, empty where there is none; raises or warns."""
    reasons = np.full(n, "", dtype=object)
    for each in refusals:
        fresh = np.asarray(each.where) & (reasons == "")
        reasons[fresh] = each.text
    if not refusals or outside in ("nan", "allow"):
        return reasons
    first = refusals[0]
    count = f" ({int(np.sum(first.where))} of {n} designs; the first:" if n > 1 else ""
    text = f"stream: {first.detail or first.text}" if not count else (
        f"stream: {first.text}{count} {first.detail})"
    )  # fmt: skip
    if outside == "warn":
        warn_user(text, RangeWarning)
        return reasons
    if first.contradiction:
        raise BadInput(text, allowed="sets that agree within 1 %, 20 % for a pressure")
    raise OutOfRange(text, hint="outside='warn', 'nan' or 'allow' changes what happens")
