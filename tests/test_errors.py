"""What an error says, and how it travels."""

from __future__ import annotations

import pickle
import warnings

import numpy as np
import pytest

import dropkit as dk
from dropkit import errors
from dropkit.errors import AmbiguousName, BadInput, DropkitError, nearest


@pytest.mark.parametrize(
    ("error", "says"),
    [
        (BadInput("it is wrong"), "it is wrong."),
        (BadInput("It is wrong.", hint="Mend it."), "It is wrong. Mend it."),
        (
            BadInput("no such word", allowed="a or b", choices=["a"]),
            "no such word. Allowed: a or b. Did you mean 'a'?",
        ),
        (
            AmbiguousName("several", choices=["a", "b", "c"], hint="b is the usual one"),
            "several. Did you mean 'a', 'b' or 'c'? b is the usual one.",
        ),
        (BadInput("what is this?", hint="a, b ..."), "what is this? a, b ..."),
    ],
)
def test_sentences_are_joined_with_one_mark_each(error: DropkitError, says: str) -> None:
    assert str(error) == says


def test_an_ambiguous_name_reads_well() -> None:
    with pytest.raises(AmbiguousName) as caught:
        dk.liquid("propanol")
    message = str(caught.value)
    assert "'1-propanol' or '2-propanol'? " in message
    assert message.endswith(".")
    assert "?." not in message
    assert ".." not in message


@pytest.mark.parametrize("name", [name for name in errors.__all__ if name[0].isupper()])
def test_every_class_is_one_of_ours_and_says_what_it_is_for(name: str) -> None:
    kind = getattr(errors, name)
    assert issubclass(kind, (DropkitError, errors.DropkitWarning))
    assert kind.__doc__


def test_an_error_travels_whole() -> None:
    error = AmbiguousName("several", allowed="one", choices=["a", "b"], hint="Say which")
    copy = pickle.loads(pickle.dumps(error))
    assert type(copy) is AmbiguousName
    assert str(copy) == str(error)
    assert copy.choices == ("a", "b")


def test_nearest_ignores_case_and_keeps_the_spelling() -> None:
    assert nearest("WEBBER", ["Weber", "ohnesorge"]) == ["Weber"]
    assert nearest("zzz", ["Weber"]) == []


@pytest.mark.parametrize(
    "ask",
    [
        lambda: dk.liquid("water").density(450.0, outside="warn"),
        lambda: dk.liquid("water").density(np.array([300.0, 450.0]), outside="warn"),
        lambda: dk.liquid("water").at("200 degC", outside="warn").viscosity,
        lambda: dk.mixture({"glycerol": 0.3, "water": "rest"}, by="mass").viscosity(
            390.0, outside="warn"
        ),
        lambda: dk.mixture({"toluene": 0.3, "acetone": "rest"}, by="mass"),
        lambda: dk.liquid("IPA").electrical_conductivity("25 degC"),
        lambda: dk.liquid("water").viscosity(100.0, outside="allow"),
        lambda: dk.air("20 degC", outside="warn", pressure="20 MPa").density,
    ],
)
def test_warnings_point_at_the_users_line_once(ask):
    with warnings.catch_warnings(record=True) as caught:
        warnings.simplefilter("always")
        ask()
    assert len(caught) == 1, [str(entry.message) for entry in caught]
    assert caught[0].filename == __file__
    assert issubclass(caught[0].category, dk.errors.DropkitWarning)
