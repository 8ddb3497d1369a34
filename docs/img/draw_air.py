"""Draws docs/img/air.png: humid air against humidity and temperature.

Run from the checkout: python docs/img/draw_air.py
"""

from __future__ import annotations

from pathlib import Path

import matplotlib as mpl

mpl.use("Agg")
import matplotlib.pyplot as plt
import numpy as np

import dropkit as dk

SHOWN = (
    ("density", 1.0, "density [kg/m3]"),
    ("viscosity", 1e6, "viscosity [uPa s]"),
    ("thermal_conductivity", 1e3, "thermal conductivity [mW/(m K)]"),
    ("heat_capacity", 1e-3, "heat capacity [kJ/(kg K)]"),
)


def main() -> None:
    """One panel per property, one line per humidity, with the 95 % band."""
    figure, panels = plt.subplots(1, 4, figsize=(13.0, 3.4), layout="constrained")
    temperature = np.linspace(273.15, 368.15, 60)
    for ax, (prop, factor, label) in zip(panels, SHOWN, strict=True):
        for humidity, colour in ((0.0, "C0"), (0.5, "C1"), (1.0, "C2")):
            value = factor * getattr(dk.air(temperature, humidity=humidity), prop)
            spread = np.array(
                [dk.air(float(t), humidity=humidity).uncertainty(prop) for t in temperature]
            )
            ax.plot(temperature - 273.15, value, color=colour, label=f"{100 * humidity:g} % RH")
            ax.fill_between(
                temperature - 273.15,
                value * (1 - 2 * spread),
                value * (1 + 2 * spread),
                color=colour,
                alpha=0.2,
                linewidth=0,
            )
        ax.set(xlabel="temperature [degC]", title=label)
        ax.title.set_fontsize(10)
    panels[0].legend(fontsize=8)
    figure.savefig(Path(__file__).with_name("air.png"), dpi=100)


if __name__ == "__main__":
    main()
