"""Equation forms: how a property depends on temperature.

A record names its form and gives the parameters; `FORMS` finds the form by that name and turns
the parameters into a fast function of one float or an in-place function of an array. One file
per theme: polynomials, exponentials, critical (powers), vapour.

Examples
--------
>>> from dropkit.properties.equations import FORMS
>>> print(FORMS["vogel"].equation)
exp(A + B/(T - C)), coefficients [A, B, C]
"""

from __future__ import annotations

import importlib
from collections.abc import Iterator, Mapping
from typing import Final, cast

from dropkit.errors import RecordError, nearest
from dropkit.properties.equations.form import ArrayBody, Form, Parameter, ScalarBody, evaluate

__all__ = ["FORMS", "ArrayBody", "Form", "Parameter", "ScalarBody", "evaluate"]

# Form -> the file that holds it, under the same name in capitals.
_HOMES: Final = {
    "constant": "polynomials",
    "polynomial": "polynomials",
    "rational": "polynomials",
    "exp_polynomial": "exponentials",
    "vogel": "exponentials",
    "critical_powers": "critical",
    "guggenheim": "critical",
    "power": "critical",
    "powers": "critical",
    "rackett": "critical",
    "watson": "critical",
    "antoine": "vapour",
    "dippr101": "vapour",
    "wagner": "vapour",
}


class _Forms(Mapping[str, Form]):
    """Every form by its name; its file is imported at first use."""

    def __getitem__(self, name: str) -> Form:
        home = _HOMES.get(name)
        if home is None:
            raise RecordError(
                f"equation form {name!r} is not known",
                allowed=", ".join(_HOMES),
                choices=nearest(str(name), _HOMES, 1),
            )
        module = importlib.import_module(f"{__name__}.{home}")
        return cast(Form, getattr(module, name.upper()))

    def __contains__(self, name: object) -> bool:
        return name in _HOMES

    def __iter__(self) -> Iterator[str]:
        return iter(_HOMES)

    def __len__(self) -> int:
        return len(_HOMES)


FORMS: Final[Mapping[str, Form]] = _Forms()
