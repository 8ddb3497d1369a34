"""Size the drop stream of a vibrated nozzle, from the liquid to the breakup length.

The plant is invented: a line that freezes drops of a glycerol-water carrier to pellets
wants 3000 drops of 600 um a second from each vibrated nozzle of 320 um. The liquids and
all their properties are real, each with its source.

Run it:  python examples/size_a_drop_stream.py [folder for the table and the picture]
"""

from __future__ import annotations

import sys
import textwrap
from pathlib import Path
from typing import Any

import dropkit as dk
from dropkit.models import jet

# SI throughout: m, Hz, m, mass fraction, K
WANTED_DROP, WANTED_RATE = 600e-6, 3000.0
NOZZLE = 320e-6
GLYCEROL, TEMPERATURE = 0.30, 293.15

NUMBERS = ["weber", "reynolds", "ohnesorge", "capillary", "bond", "froude"]


def carrier(glycerol: float = GLYCEROL) -> Any:
    """The liquid, by mass."""
    return dk.mixture({"glycerol": glycerol, "water": "rest"}, by="mass")


def stream(glycerol: float, temperature: float, flow: float) -> dict[str, float]:
    """What one nozzle does, in SI. A short nozzle: the jet is as wide as the hole."""
    state = carrier(glycerol).at(temperature)
    liquid = (state.density, state.viscosity, state.surface_tension)
    diameter = NOZZLE
    velocity = jet.jet_velocity(flow, diameter)
    weber_wave = jet.most_unstable_wavelength_viscous_longwave(*liquid, diameter)
    rayleigh_wave = jet.most_unstable_wavelength_inviscid(diameter)
    best = jet.drive_frequency(velocity, weber_wave)
    length = jet.natural_breakup_length(*liquid, velocity, diameter)
    return {
        "density": state.density,
        "viscosity": state.viscosity,
        "surface_tension": state.surface_tension,
        "velocity": velocity,
        "weber": dk.numbers.weber(state.density, state.surface_tension, velocity, diameter),
        "ohnesorge": dk.numbers.ohnesorge(*liquid, diameter),
        "wavelength_rayleigh": rayleigh_wave,
        "frequency_rayleigh": jet.drive_frequency(velocity, rayleigh_wave),
        "wavelength_weber": weber_wave,
        "frequency_weber": best,
        "drop_at_best": jet.drop_diameter_from_flow(flow, best),
        "growth_at_best": jet.maximum_growth_viscous_longwave(*liquid, diameter),
        "breakup_length": length.length,
        "breakup_low": length.low,
        "breakup_high": length.high,
    }


def picture(path: Path, cases: dict[str, dict[str, float]]) -> None:
    """Growth against drive frequency, and breakup lengths with their bands."""
    import numpy as np
    from matplotlib import pyplot

    base = cases["as set"]
    diameter = NOZZLE
    figure, (left, right) = pyplot.subplots(1, 2, figsize=(10, 4), layout="constrained")
    frequency = np.linspace(200.0, base["velocity"] / (np.pi * diameter), 300)[:-1]
    wave = base["velocity"] / frequency
    liquid = (base["density"], base["viscosity"], base["surface_tension"])
    weber = jet.growth_rate_viscous_longwave(*liquid, diameter, wave)
    rayleigh = jet.growth_rate_inviscid(liquid[0], liquid[2], diameter, wave)
    left.plot(frequency / 1e3, rayleigh, "--", label="Rayleigh 1878, no viscosity")
    left.plot(frequency / 1e3, weber, label="Weber 1931, viscous long wave")
    left.axvline(WANTED_RATE / 1e3, color="0.4", linewidth=1, label="wanted drop rate")
    left.set(xlabel="drive frequency [kHz]", ylabel="growth rate [1/s]", ylim=(0, None))
    left.set_title("how fast a wave grows")
    left.legend(fontsize="small")
    for place, case in enumerate(cases.values()):
        middle = 1e3 * case["breakup_length"]
        ends = [[middle - 1e3 * case["breakup_low"]], [1e3 * case["breakup_high"] - middle]]
        right.errorbar(middle, place, xerr=ends, fmt="o", color="C1", capsize=4)
    right.set(yticks=range(len(cases)), yticklabels=list(cases))
    right.set(xlabel="breakup length without drive [mm], 95 % band", xlim=(0, None))
    right.set_title("where the jet breaks")
    right.invert_yaxis()
    figure.savefig(path, dpi=120)
    pyplot.close(figure)


def main(folder: str | Path = ".") -> dict[str, float]:
    """Print the whole job, save its table and picture, and return the results in SI."""
    import pandas as pd

    folder = Path(folder)
    liquid = carrier()
    state = liquid.at((TEMPERATURE - 273.15, "degC"))
    flow = jet.flow_from_drop(WANTED_DROP, WANTED_RATE)

    print("Invented plant, real liquids: pellets from a vibrated nozzle\n")
    print(f"Wanted: {WANTED_RATE:g} drops of {1e6 * WANTED_DROP:g} um a second from a nozzle of")
    print(f"{1e6 * NOZZLE:g} um, which takes {6e7 * flow:.4g} mL/min.\n")
    print(state)
    print("\nSources")
    for line in dk.cite(state).splitlines():
        print(textwrap.fill(line, 98, initial_indent="- ", subsequent_indent="  "))

    base = stream(GLYCEROL, TEMPERATURE, flow)
    print("\nNumbers, on the diameter of the hole")
    sheet = state.numbers(NOZZLE, base["velocity"]).table()
    print(sheet.loc[NUMBERS, ["value", "compares"]].to_string(float_format="{:.4g}".format))

    cases = {
        "as set": base,
        "5 K colder": stream(GLYCEROL, TEMPERATURE - 5.0, flow),
        "5 K warmer": stream(GLYCEROL, TEMPERATURE + 5.0, flow),
        "28 % glycerol": stream(GLYCEROL - 0.02, TEMPERATURE, flow),
        "32 % glycerol": stream(GLYCEROL + 0.02, TEMPERATURE, flow),
    }
    shown = {
        "viscosity [mPa*s]": ("viscosity", 1e3),
        "surface tension [mN/m]": ("surface_tension", 1e3),
        "jet velocity [m/s]": ("velocity", 1.0),
        "wavelength, Rayleigh [um]": ("wavelength_rayleigh", 1e6),
        "frequency, Rayleigh [Hz]": ("frequency_rayleigh", 1.0),
        "wavelength, Weber [um]": ("wavelength_weber", 1e6),
        "frequency, Weber [Hz]": ("frequency_weber", 1.0),
        "drop at that frequency [um]": ("drop_at_best", 1e6),
        "breakup length [mm]": ("breakup_length", 1e3),
        "  95 % band, low [mm]": ("breakup_low", 1e3),
        "  95 % band, high [mm]": ("breakup_high", 1e3),
    }
    table = pd.DataFrame(
        {
            name: {label: factor * case[key] for label, (key, factor) in shown.items()}
            for name, case in cases.items()
        }
    )
    print("\nThe stream, and what temperature and composition do to it")
    print(table.to_string(float_format=lambda value: f"{value:.4g}"))

    drop = jet.drop_diameter_from_flow(flow, WANTED_RATE)
    wave = base["velocity"] / WANTED_RATE
    growth = jet.growth_rate_viscous_longwave(
        base["density"], base["viscosity"], base["surface_tension"], NOZZLE, wave
    )
    share = growth / base["growth_at_best"]
    print(f"\nDriven at {WANTED_RATE:g} Hz: drops of {1e6 * drop:.1f} um, ", end="")
    print(f"{1e9 * flow / WANTED_RATE:.4g} uL each; wavelength {wave / NOZZLE:.2f} jet")
    print(f"diameters, growing at {100 * share:.0f} % of the fastest.")

    air = dk.air(TEMPERATURE)
    gas_weber = dk.numbers.gas_weber(base["surface_tension"], base["velocity"], NOZZLE, air.density)
    print("\nKnow before use, besides the cautions of the liquid above")
    for text in (
        "the breakup length is that of a jet left to itself; a drive shortens it",
        "the jet is taken as wide as the hole; jets contract or swell by up to a fifth: measure it",
        f"gas Weber number {gas_weber:.2g}: the breakup length holds below about 0.4 to 1.2",
        "a line under pressure: follow the maker's limits, local codes and licensed practice",
    ):
        print(textwrap.fill(text, 98, initial_indent="- ", subsequent_indent="  "))

    table.to_csv(folder / "drop_stream.csv", index_label="quantity")
    picture(folder / "drop_stream.png", cases)
    print("\nSaved drop_stream.csv and drop_stream.png")
    return {**base, "flow": flow, "drop": drop, "growth_share": share, "gas_weber": gas_weber}


if __name__ == "__main__":
    main(*sys.argv[1:2])
