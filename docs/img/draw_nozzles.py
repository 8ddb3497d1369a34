"""Draws docs/img/nozzles.png: discharge coefficients of the models over Reynolds number.

Run from the checkout: python docs/img/draw_nozzles.py
"""

from __future__ import annotations

import csv
from pathlib import Path

import matplotlib as mpl

mpl.use("Agg")
import matplotlib.pyplot as plt
import numpy as np

from dropkit.models import nozzle
from dropkit.records import data_dir

# A made-up liquid: only the Reynolds number counts.
DENSITY, VISCOSITY, TENSION, HOLE = 1000.0, 1e-3, 1e-9, 1e-3
AREA = np.pi / 4.0 * HOLE**2


def coefficient(flow: object, reynolds: np.ndarray, ratio: float, **options: object) -> np.ndarray:
    """Flow over that of a loss-free jet, at Reynolds numbers on the loss-free speed."""
    pressure = (reynolds * VISCOSITY / HOLE) ** 2 / (2.0 * DENSITY)
    found = flow(
        DENSITY, VISCOSITY, TENSION, pressure, HOLE, ratio * HOLE, outside="nan", **options
    )
    return np.asarray(found / (AREA * np.sqrt(2.0 * pressure / DENSITY)))


def measured() -> tuple[np.ndarray, np.ndarray]:
    """Water from a sharp orifice, 1911, with the viscosity of water at 10 degC."""
    text = (data_dir() / "published" / "nozzles" / "Britannica1911.csv").read_text("utf-8")
    rows = list(csv.DictReader(x for x in text.splitlines() if not x.startswith("#")))
    head = np.array([float(row["head_m"]) for row in rows])
    d = np.array([float(row["nozzle_diameter_m"]) for row in rows])
    speed = np.sqrt(2.0 * 9.8072 * head)
    return speed * d / 1.31e-6, np.array([float(row["discharge_coefficient"]) for row in rows])


def main() -> None:
    """Draw the picture."""
    figure, ax = plt.subplots(figsize=(7.5, 4.8), layout="constrained")
    x = np.geomspace(10.0, 2e5, 400)
    ax.plot(
        x, coefficient(nozzle.flow_thin_plate, x, 0.1), color="black", label="thin plate, 0.1 d"
    )
    for colour, ratio in (("C0", 2.0), ("C1", 4.0), ("C2", 10.0)):
        long = coefficient(nozzle.flow_long_orifice, x, ratio)
        ax.plot(x, long, color=colour, label=f"long orifice (Lichtarowicz), {ratio:g} d")
        tube = coefficient(nozzle.flow_developing_tube, x, ratio)
        sharp = coefficient(nozzle.flow_developing_tube, x, ratio, entry_loss=0.5)
        ax.fill_between(x, sharp, tube, color=colour, alpha=0.15, linewidth=0.0)
    ax.plot([], [], color="0.6", linewidth=6, alpha=0.4, label="developing tube, sharp to rounded")
    reynolds, found = measured()
    ax.plot(reynolds, found, "o", color="C3", markersize=4, label="measured, water, 1911 (11)")
    ax.set(
        xscale="log",
        xlabel="Reynolds number on the loss-free speed, d sqrt(2 rho dp)/mu",
        ylabel="discharge coefficient",
        xlim=(10.0, 2e5),
        ylim=(0.0, 1.0),
        title="Holes of different length",
    )
    ax.legend(fontsize=8, loc="lower right")
    figure.savefig(Path(__file__).with_name("nozzles.png"), dpi=110)


if __name__ == "__main__":
    main()
