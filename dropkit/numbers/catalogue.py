"""The list of all numbers, read from the files of this folder: there is no list to keep."""

from __future__ import annotations

import importlib
import inspect
import pkgutil
import re
from dataclasses import dataclass
from functools import cache
from typing import TYPE_CHECKING, Any, Final

import dropkit.numbers
from dropkit.boundary import Boundary
from dropkit.numbers.limits import LIMITS, Limit

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["Entry", "entries", "overview"]

# First line of a docstring: "Weber number We: inertia of the liquid against surface tension."
_TITLE: Final = re.compile(r"(?P<title>.+?) (?P<symbol>\S+): (?P<compares>.+)\.")
# A parameter and the first sentence of its text, up to the unit.
_PARAMETER: Final = re.compile(
    r"^ {4}(?P<name>\w+) : [^\n]+\n {8}(?P<text>.+?)(?: \[|\.\n)", re.M | re.S
)
# Arguments that say which size a number is built on, in the order of preference.
_SIZES: Final = ("length", "radius")


@dataclass(frozen=True, slots=True)
class Entry:
    """One number as the catalogue lists it.

    Parameters
    ----------
    name : str
        Name of the function in `dropkit.numbers`.
    theme : str
        The file that holds it.
    title, symbol : str
        What it is called, and its symbol.
    compares : str
        What it compares, in one line.
    arguments : tuple of str
        Names of the arguments, in order.
    optional : tuple of str
        Those of them that may be left out.
    scale : str
        The length that it is built on; empty where there is none.
    returns : str
        Kind of the result: ``"ratio"`` for a number, ``"length"``, ``"time"`` ... for a scale.
    limits : tuple of Limit
        What the trade quotes.
    """

    name: str
    theme: str
    title: str
    symbol: str
    compares: str
    arguments: tuple[str, ...]
    optional: tuple[str, ...]
    scale: str
    returns: str
    limits: tuple[Limit, ...]

    @property
    def function(self) -> Boundary[..., Any]:
        """The number itself."""
        found: Boundary[..., Any] = getattr(dropkit.numbers, self.name)
        return found


def _entry(name: str, theme: str, number: Boundary[..., Any]) -> Entry:
    # Under python -OO there are no docstrings: names and arguments remain.
    doc = number.__doc__ or ""
    title = _TITLE.match(doc)
    texts = {found["name"]: " ".join(found["text"].split()) for found in _PARAMETER.finditer(doc)}
    parameters = inspect.signature(number).parameters
    arguments = tuple(parameters)
    optional = tuple(w for w, one in parameters.items() if one.default is not one.empty)
    size = next((size for size in _SIZES if size in arguments), "")
    return Entry(
        name=name,
        theme=theme,
        title=title["title"] if title else "",
        symbol=title["symbol"] if title else "",
        compares=title["compares"] if title else "",
        arguments=arguments,
        optional=optional,
        scale=texts.get(size, ""),
        returns=number.returns,
        limits=tuple(limit for limit in LIMITS if limit.number == name),
    )


@cache
def entries() -> tuple[Entry, ...]:
    """All numbers and scales, by theme and in the order of their files.

    Returns
    -------
    tuple of Entry
        One entry for each.

    Examples
    --------
    >>> [entry.symbol for entry in entries() if entry.name == "ohnesorge"]
    ['Oh']
    """
    found: list[Entry] = []
    for module_info in pkgutil.iter_modules(dropkit.numbers.__path__):
        module = importlib.import_module(f"dropkit.numbers.{module_info.name}")
        found.extend(
            _entry(name, module_info.name, value)
            for name, value in vars(module).items()
            if isinstance(value, Boundary) and value.__module__ == module.__name__
        )
    return tuple(found)


def overview() -> pd.DataFrame:
    """All numbers and scales as a table: what each compares, its arguments, length and limits.

    Returns
    -------
    pandas.DataFrame
        One row for each number, its name as index.

    See Also
    --------
    numbers_sheet : The values of all that a liquid and a size allow.

    Examples
    --------
    >>> from dropkit import numbers
    >>> numbers.overview().loc["weber_radius", "scale"]
    'Radius of the jet, drop or nozzle'
    """
    import pandas as pd

    rows = [
        {
            "name": entry.name,
            "symbol": entry.symbol,
            "compares": entry.compares,
            "arguments": ", ".join(entry.arguments),
            "scale": entry.scale,
            "returns": entry.returns,
            "limits": "; ".join(map(str, entry.limits)),
            "theme": entry.theme,
        }
        for entry in entries()
    ]
    return pd.DataFrame(rows).set_index("name")
