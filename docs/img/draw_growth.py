"""Draws docs/img/growth.png: growth on a viscous jet by the full relation and by Weber's.

Run from the checkout: python docs/img/draw_growth.py
"""

from __future__ import annotations

from pathlib import Path

import matplotlib as mpl

mpl.use("Agg")
import matplotlib.pyplot as plt
import numpy as np

from dropkit.models import jet

OHNESORGE = (0.01, 0.1, 1.0, 10.0)  # on the radius


def growth_panel(ax: plt.Axes) -> None:
    """Growth over wavenumber, full lines by the full relation, broken ones by Weber's."""
    x = np.linspace(0.002, 1.0, 800)
    for colour, oh in enumerate(OHNESORGE):
        liquid = (1.0, oh, 1.0, 2.0)  # radius, density and surface tension 1
        full = jet.reduced_growth_viscous_full(x, oh)
        weber = jet.growth_rate_viscous_longwave(*liquid, 2.0 * np.pi / x)
        ax.plot(x, full, color=f"C{colour}", label=f"Oh = {oh:g}")
        ax.plot(x, weber, "--", color=f"C{colour}", linewidth=1.0)
        band = jet.growth_band_viscous_full(*liquid)
        ends = 2.0 * np.pi / np.array([band.longest, band.shortest])
        ax.plot(ends, jet.reduced_growth_viscous_full(ends, oh), "|", color=f"C{colour}", ms=9)
        most = 2.0 * np.pi / jet.most_unstable_wavelength_viscous_full(*liquid)
        ax.plot(most, jet.maximum_growth_viscous_full(*liquid), "o", color=f"C{colour}", ms=4)
    ax.set(
        xlabel="reduced wavenumber k a = pi d / wavelength",
        ylabel="growth rate / sqrt(gamma / (rho a^3))",
        yscale="log",
        xlim=(0.0, 1.02),
        ylim=(2e-3, 0.5),
        title="Full relation (lines) and Weber's (broken)\ndots: fastest wave, ticks: ends of the 0.8 band",
    )
    ax.legend(fontsize=8, loc="lower center", ncols=2, title="Ohnesorge number on the radius")


def difference_panel(ax: plt.Axes) -> None:
    """Weber's growth over the full relation's."""
    x = np.linspace(0.002, 0.998, 800)
    for colour, oh in enumerate(OHNESORGE):
        weber = jet.growth_rate_viscous_longwave(1.0, oh, 1.0, 2.0, 2.0 * np.pi / x)
        more = 100.0 * (weber / jet.reduced_growth_viscous_full(x, oh) - 1.0)
        ax.plot(x, more, color=f"C{colour}", label=f"Oh = {oh:g}")
    ax.set(
        xlabel="reduced wavenumber k a = pi d / wavelength",
        ylabel="Weber's growth above the full relation, %",
        xlim=(0.0, 1.0),
        ylim=(0.0, 6.0),
        title="What the long-wave form costs",
    )
    ax.legend(fontsize=8)


def main() -> None:
    """Draw both panels."""
    figure, axes = plt.subplots(1, 2, figsize=(11.0, 4.6), layout="constrained")
    growth_panel(axes[0])
    difference_panel(axes[1])
    figure.savefig(Path(__file__).with_name("growth.png"), dpi=110)


if __name__ == "__main__":
    main()
