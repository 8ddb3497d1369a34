"""The catalogue lists what the folders hold, and every file says what it must."""

from __future__ import annotations

from typing import Any

import numpy as np
import pytest

from dropkit import models
from dropkit.boundary import Boundary
from dropkit.errors import BadInput, UnknownName
from dropkit.models.catalogue import model_entries, published_models
from dropkit.models.families import family_modules, family_names, lazy_family, model_families
from dropkit.models.published import MARKS, Published
from dropkit.records import source

MODULES = [
    module for family in model_families() for module in family_modules(f"dropkit.models.{family}")
]


def test_every_boundary_of_every_file_is_listed() -> None:
    listed = {(entry.module, entry.name) for entry in model_entries()}
    there = {
        (module.__name__, name)
        for module in MODULES
        for name, thing in vars(module).items()
        if isinstance(thing, Boundary) and thing.__module__ == module.__name__
    }
    assert listed == there
    assert len(listed) >= 17


@pytest.mark.parametrize("module", MODULES, ids=lambda module: module.__name__)
def test_every_file_states_its_model(module: object) -> None:
    model = module.MODEL  # type: ignore[attr-defined] # that is what is tested
    assert isinstance(model, Published)
    assert model.mark in MARKS
    assert model.gives
    assert model.holds
    assert model.place
    assert model.agreement
    for key in model.sources:
        assert source(key).citation


def test_the_file_name_says_what_and_how() -> None:
    for module in MODULES:
        assert "_" in module.__name__.rpartition(".")[2]


def test_table() -> None:
    table = published_models("jet")
    row = table.loc[("jet", "growth_rate_inviscid")]
    assert row["inputs"].startswith("density [kg/m^3], surface_tension [N/m], jet_diameter [m]")
    assert row["result"] == "1/s"
    assert "0 to 1" in row["range"]
    assert row["sources"] == "Rayleigh1878"
    assert not table.isna().to_numpy().any()


def test_unknown_family() -> None:
    with pytest.raises(UnknownName, match="jet"):
        model_entries("jets")


@pytest.mark.parametrize("family", [np.array([1.0, 2.0]), np.array(["jet"]), 1, ["jet"]], ids=str)
def test_only_text_names_a_family(family: Any) -> None:
    for ask in (model_entries, published_models):
        with pytest.raises(BadInput, match="names no family"):
            ask(family)


def test_names_are_found_lazily() -> None:
    from dropkit.models import jet

    assert models.jet is jet
    assert {"jet", "catalogue"} <= set(dir(models))
    assert set(family_names("dropkit.models.jet")) <= set(dir(jet))
    for name in ("growth_rate", "_growth"):
        with pytest.raises(AttributeError, match=name):
            getattr(jet, name)
    with pytest.raises(AttributeError, match="jets"):
        models.jets  # noqa: B018 # the attribute access is what is tested
    fetch, _ = lazy_family("dropkit.models.jet")
    assert fetch("growth_inviscid").__name__ == "dropkit.models.jet.growth_inviscid"
