"""Draws docs/img/jets.png: growth curves, and measured breakup lengths with the models.

Run from the checkout: python docs/img/draw_jets.py
"""

from __future__ import annotations

from pathlib import Path

import matplotlib as mpl

mpl.use("Agg")
import matplotlib.pyplot as plt
import numpy as np

from dropkit.models import jet
from dropkit.published_rows import published_file
from dropkit.records import data_dir

STUDIES = {
    "AssetBales1951": "Asset & Bales 1951",
    "Grant1965": "Grant 1965",
    "Sterling1969": "Sterling 1969",
    "Phinney1970": "Phinney 1970",
    "Arai1985": "Arai et al. 1985",
    "Mansour1994": "Mansour 1994",
}


def growth_panel(ax: plt.Axes) -> None:
    """Growth rate over wavelength for some Ohnesorge numbers on the diameter."""
    waves = np.linspace(np.pi, 16.0, 600)
    scale = np.sqrt(8.0)  # growth in units of sqrt(gamma/(rho a^3))
    rayleigh = jet.growth_rate_inviscid(1.0, 1.0, 1.0, waves) / scale
    ax.plot(waves, rayleigh, color="black", label="Rayleigh, inviscid")
    for ohnesorge, colour in ((0.001, "C0"), (0.03, "C1"), (0.1, "C2"), (0.3, "C3")):
        growth = jet.growth_rate_viscous_longwave(1.0, ohnesorge, 1.0, 1.0, waves) / scale
        ax.plot(waves, growth, "--", color=colour, label=f"Weber, Oh = {ohnesorge:g}")
        most = jet.most_unstable_wavelength_viscous_longwave(1.0, ohnesorge, 1.0, 1.0)
        top = jet.maximum_growth_viscous_longwave(1.0, ohnesorge, 1.0, 1.0) / scale
        ax.plot(most, top, "o", color=colour, markersize=4)
    most = jet.most_unstable_wavelength_inviscid(1.0)
    ax.plot(most, jet.maximum_growth_inviscid(1.0, 1.0, 1.0) / scale, "o", color="black", ms=4)
    ax.axvline(np.pi, color="0.6", linewidth=0.8)
    ax.annotate("cut-off, pi d", (np.pi, 0.01), (3.4, 0.012), fontsize=8, color="0.4")
    ax.set(
        xlabel="wavelength / jet diameter",
        ylabel="growth rate / sqrt(gamma / (rho a^3))",
        xlim=(2.5, 16.0),
        ylim=(0.0, 0.4),
        title="Growth of waves (dots: most unstable)",
    )
    ax.legend(fontsize=8)


def length_panel(ax: plt.Axes) -> None:
    """Measured lengths in the Rayleigh regime over sqrt(We)(1 + 3 Oh)."""
    x = np.geomspace(1.2, 150.0, 100)
    estimate = jet.natural_breakup_length(1.0, 1e-6, 1.0, x, 1.0, outside="allow")
    ax.fill_between(x, estimate.low, estimate.high, color="0.88", label="95 % band, factor 2.4")
    ax.plot(x, estimate.length, color="0.3", label="natural_breakup_length, C = 10")
    inside = np.geomspace(2.9, 67.0, 50)
    pipe = 19.5 * inside**0.85
    ax.plot(inside, pipe, "--", color="0.3", label="laminar_pipe_breakup_length")
    for colour, (key, name) in enumerate(STUDIES.items()):
        found = published_file(data_dir() / "published" / "jets" / f"{key}.csv")
        kept = [row for row in found if row["regime"] == "Rayleigh"]
        weber = np.array([float(row["We_d"]) for row in kept])
        reynolds = np.array([float(row["Re_d"]) for row in kept])
        length = np.array([float(row["breakup_length_over_d"]) for row in kept])
        reach = np.sqrt(weber) + 3.0 * weber / reynolds
        label = f"{name} ({len(kept)})"
        ax.plot(reach, length, "o", color=f"C{colour}", markersize=3.5, alpha=0.8, label=label)
    ax.set(
        xscale="log",
        yscale="log",
        xlabel="sqrt(We) (1 + 3 Oh), on the jet diameter",
        ylabel="breakup length / jet diameter",
        xlim=(1.2, 150.0),
        ylim=(8.0, 2000.0),
        title="Natural breakup, Rayleigh regime, measured",
    )
    ax.legend(fontsize=7, loc="lower right")


def main() -> None:
    """Draw both panels into one picture."""
    figure, (left, right) = plt.subplots(1, 2, figsize=(11.0, 4.6), layout="constrained")
    growth_panel(left)
    length_panel(right)
    figure.savefig(Path(__file__).with_name("jets.png"), dpi=110)


if __name__ == "__main__":
    main()
