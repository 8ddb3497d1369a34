"""Pictures of properties: what is drawn is what the fluids say."""

from __future__ import annotations

import matplotlib as mpl
import numpy as np
import pytest

import dropkit as dk
from dropkit.errors import BadInput, MissingProperty, UnknownName

mpl.use("Agg")
from matplotlib import pyplot


@pytest.fixture(autouse=True)
def _close():
    yield
    pyplot.close("all")


def test_curve_points_and_band_over_temperature():
    ax = dk.plots.property_over_temperature("ethanol", property="viscosity")
    curve = ax.get_lines()[0]
    celsius, shown = curve.get_data()
    expected = 1e3 * dk.liquid("ethanol").viscosity(celsius + 273.15, outside="nan")
    assert np.allclose(shown, expected, rtol=1e-12)
    assert ax.get_ylabel() == "viscosity [mPa*s]"
    assert len(ax.collections) == 1  # the band
    assert len(ax.get_lines()) > 3  # published points, one set per file


def test_several_fluids_on_a_given_axes():
    figure, ax = pyplot.subplots()
    mine = dk.fluid("mine", density=1000.0)
    found = dk.plots.property_over_temperature(
        "water", mine, property="density", between=("10 degC", "40 degC"), points=False, ax=ax
    )
    assert found is ax
    assert [line.get_label() for line in ax.get_lines()] == ["water", "mine"]
    assert ax.get_lines()[0].get_xdata()[0] == pytest.approx(10.0)
    figure.canvas.draw()


def test_curve_and_points_over_composition():
    ax = dk.plots.property_over_composition(
        "water", "glycerol", property="viscosity", at=["20 degC", "40 degC"], by="mole"
    )
    share, shown = ax.get_lines()[0].get_data()
    mix = dk.mixture({"water": float(share[50]), "glycerol": "rest"}, by="mole")
    assert shown[50] == pytest.approx(1e3 * mix.viscosity(293.15), rel=1e-9)
    labels = [text.get_text() for text in ax.get_legend().get_texts()]
    assert "SegurOberstar1951" in labels
    assert labels.count("SegurOberstar1951") == 1
    # Segur & Oberstar 1951: 50 % by mass has 6.00 mPa*s at 20 degC; it must lie on the curve.
    points = next(x for x in ax.get_lines() if x.get_label() == "SegurOberstar1951")
    near = np.interp(points.get_xdata(), share, shown)
    assert np.allclose(near, points.get_ydata(), rtol=0.05)


@pytest.mark.parametrize(
    ("draw", "error"),
    [
        (lambda: dk.plots.property_over_temperature(property="viscosity"), BadInput),
        (lambda: dk.plots.property_over_temperature("water", property="colour"), UnknownName),
        (
            lambda: dk.plots.property_over_temperature(
                dk.fluid("mine", density=1000.0), property="viscosity"
            ),
            MissingProperty,
        ),
        (
            lambda: dk.plots.property_over_composition(
                "water", "H2O", property="viscosity", at=300.0
            ),
            BadInput,
        ),
    ],
)
def test_slips(draw, error):
    with pytest.raises(error):
        draw()
