"""Lists every published model from the folders: what it gives, takes, its range and source."""

from __future__ import annotations

import inspect
from dataclasses import dataclass
from typing import TYPE_CHECKING, Any

from dropkit.boundary import Boundary
from dropkit.errors import BadInput, UnknownName, nearest
from dropkit.models.families import family_modules, model_families
from dropkit.unit_table import KINDS

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["ModelEntry", "model_entries", "published_models"]


@dataclass(frozen=True, slots=True)
class ModelEntry:
    """One public function of one published model.

    Parameters
    ----------
    name : str
        The function.
    family : str
        The folder, such as ``"jet"``.
    gives : str
        What it gives, in one line.
    inputs : tuple of str
        Arguments with their SI units.
    result : str
        Unit of the result in SI.
    holds : str
        When the model holds.
    range : str
        The ranges that it checks.
    sources : tuple of str
        Source keys.
    mark : str
        How the formula was seen: S, S2, M, M+ or C.
    agreement : str
        How well it agrees with measured points.
    module : str
        The file's module name.

    Examples
    --------
    >>> entry = model_entries("jet")[0]
    >>> entry.family
    'jet'
    """

    name: str
    family: str
    gives: str
    inputs: tuple[str, ...]
    result: str
    holds: str
    range: str
    sources: tuple[str, ...]
    mark: str
    agreement: str
    module: str

    def __str__(self) -> str:
        return f"{self.family}.{self.name}: {self.gives}"


def model_entries(family: str | None = None) -> tuple[ModelEntry, ...]:
    """Every public function of the published models.

    Parameters
    ----------
    family : str, optional
        One folder, such as ``"jet"``; all by default.

    Returns
    -------
    tuple of ModelEntry
        By family, file and order within the file.

    Raises
    ------
    UnknownName
        For a family that there is not.
    BadInput
        For what is neither text nor None.

    Examples
    --------
    >>> print(*[entry for entry in model_entries("jet") if entry.name == "jet_velocity"])
    jet.jet_velocity: Mean speed of a round jet from its volume flow.
    """
    families = model_families()
    if family is not None and not isinstance(family, str):
        raise BadInput(
            f"a {type(family).__name__} names no family of models", allowed=", ".join(families)
        )
    if family is not None and family not in families:
        raise UnknownName(
            f"there is no family of models '{family}'",
            allowed=", ".join(families),
            choices=nearest(family, families),
        )
    found = []
    for each in families if family is None else (family,):
        for module in family_modules(f"dropkit.models.{each}"):
            for name in module.__all__:
                thing = getattr(module, name)
                if isinstance(thing, Boundary):
                    found.append(_entry(each, module, name, thing))
    return tuple(found)


def published_models(family: str | None = None) -> pd.DataFrame:
    """The table of all published models.

    Parameters
    ----------
    family : str, optional
        One folder, such as ``"jet"``; all by default.

    Returns
    -------
    pandas.DataFrame
        One row per function, indexed by family and name.

    Raises
    ------
    UnknownName
        For a family that there is not.
    BadInput
        For what is neither text nor None.

    Examples
    --------
    >>> from dropkit.models import catalogue
    >>> catalogue.published_models("jet").loc[("jet", "jet_velocity"), "result"]
    'm/s'
    """
    import pandas as pd

    rows = [
        {
            "family": entry.family,
            "name": entry.name,
            "gives": entry.gives,
            "inputs": ", ".join(entry.inputs),
            "result": entry.result,
            "range": entry.range,
            "holds": entry.holds,
            "sources": ", ".join(entry.sources),
            "mark": entry.mark,
            "agreement": entry.agreement,
        }
        for entry in model_entries(family)
    ]
    return pd.DataFrame(rows).set_index(["family", "name"])


def _entry(family: str, module: Any, name: str, function: Boundary[..., Any]) -> ModelEntry:
    model = module.MODEL
    kinds = function.returns
    result = kinds[0] if isinstance(kinds, tuple) else kinds
    return ModelEntry(
        name=name,
        family=family,
        gives=(inspect.getdoc(function) or "").partition("\n")[0],
        inputs=tuple(f"{word} [{_unit(kind)}]" for word, kind in function.kinds.items()),
        result=_unit(result),
        holds=model.holds,
        range="; ".join(f"{limits.what}: {limits}" for limits in model.ranges),
        sources=model.sources,
        mark=model.mark,
        agreement=model.agreement,
        module=module.__name__,
    )


def _unit(kind: str) -> str:
    return KINDS[kind].si or "-"
