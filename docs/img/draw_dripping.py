"""Draws docs/img/dripping.png: published drop weight factors, and weighed drops of water.

Run from the checkout: python docs/img/draw_dripping.py
"""

from __future__ import annotations

from pathlib import Path

import matplotlib as mpl

mpl.use("Agg")
import matplotlib.pyplot as plt
import numpy as np

import dropkit as dk
from dropkit.models import dripping
from dropkit.published_rows import published_file
from dropkit.records import data_dir

CURVES = (
    ("table", "Harkins & Brown 1919, table", "black", "-"),
    ("quadratic", "Heertjes et al. 1971", "C0", "--"),
    ("polynomial", "Lee, Chan & Pogaku 2008", "C1", "-."),
    ("power", "Yildirim, Xu & Basaran 2005", "C2", ":"),
)


def points(name: str) -> list[dict[str, str]]:
    """Rows of a file of published drop weights."""
    return published_file(data_dir() / "published" / "dripping" / f"{name}.csv")


def column(rows: list[dict[str, str]], name: str) -> np.ndarray:
    """One column as numbers."""
    return np.array([float(row[name]) for row in rows])


def factor_panel(ax: plt.Axes) -> None:
    """Share of the ideal drop weight over the tip ratio."""
    compared = dripping.drop_weight_factors_compared(np.linspace(0.005, 1.2, 240))
    for word, label, colour, line in CURVES:
        ax.plot(compared.index, compared[word], line, color=colour, label=label, linewidth=1.3)
    rows = points("Rayleigh1899")
    reciprocal, weight = column(rows, "T_over_g_sigma_a2"), column(rows, "gM_over_Ta")
    ax.plot(
        (reciprocal * weight) ** (-1 / 3), weight / (2 * np.pi), "o", color="C3", ms=5,
        label="Rayleigh 1899, slow water drops",
    )  # fmt: skip
    ax.set(xlabel="tip radius / (drop volume)^(1/3)", ylabel="share of the ideal drop weight")
    ax.set(xlim=(0, 1.25), ylim=(0.55, 1.02))
    ax.legend(fontsize=8)


def water_panel(ax: plt.Axes) -> None:
    """Mass of a water drop over the diameter of the tip."""
    water = dk.liquid("water")
    density, tension = water.density(288.15), water.surface_tension(288.15)
    tip = np.geomspace(0.3e-3, 14e-3, 200)
    found = dripping.drop_volume_spread(density, tension, tip)
    mass = 1e6 * density
    ax.fill_between(1e3 * tip, mass * found.low, mass * found.high, color="0.8", label="spread")
    ax.plot(1e3 * tip, mass * found.volume, color="black", label="slow, by the table")
    ideal = dripping.drop_mass_ideal(tension, tip)
    ax.plot(1e3 * tip, 1e6 * ideal, "--", color="0.5", label="ideal drop (Tate)")
    flow = found.volume * 1.0
    fast = dripping.drop_volume_flow(density, tension, flow, tip, 1.2, 1.8e-5, outside="nan")
    ax.plot(1e3 * tip, mass * fast, ":", color="C0", label="1 drop/s, Scheele & Meister")
    rows = points("Eschbaum1895")
    ax.plot(1e3 * column(rows, "outer_diameter_m"), 1e6 * column(rows, "mass_kg"), "s",
            color="C3", ms=5, label="Eschbaum 1895, rate not told")  # fmt: skip
    ax.plot(3.0, 50.0, "D", color="C1", ms=6, label="standard dropper, 1 drop/s")
    ax.set(xscale="log", yscale="log", xlabel="tip diameter [mm]", ylabel="mass of a drop [mg]")
    ax.legend(fontsize=8)


def main() -> None:
    """Both panels."""
    figure, (left, right) = plt.subplots(1, 2, figsize=(11.0, 4.2), layout="constrained")
    factor_panel(left)
    water_panel(right)
    figure.savefig(Path(__file__).with_name("dripping.png"), dpi=100)


if __name__ == "__main__":
    main()
