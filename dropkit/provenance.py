"""Where a value comes from: grades, sources, the trail of a result, and `cite`.

A grade says how far a value can be trusted. From best to worst:

``reference``  a standard or reference equation with one independent measured check;
``measured``   a fit to published data on which two independent sources agree;
``own``        the user's own value;
``single``     one source that was seen;
``recalled``   from memory: at least 5 % uncertain, warns, counts towards no target;
``estimated``  a prediction, without data for this liquid or pair.
"""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import asdict, dataclass, field
from typing import Any, Final, Literal, TypeAlias

from dropkit.errors import BadInput

__all__ = ["GRADES", "Grade", "RecordUse", "Source", "Trail", "cite", "worst_grade"]

Grade: TypeAlias = Literal["reference", "measured", "own", "single", "recalled", "estimated"]
GRADES: Final[tuple[Grade, ...]] = (
    "reference",
    "measured",
    "own",
    "single",
    "recalled",
    "estimated",
)


def worst_grade(grades: Iterable[Grade]) -> Grade:
    """The least trustworthy of some grades.

    Examples
    --------
    >>> worst_grade(["reference", "single", "measured"])
    'single'
    """
    return max(grades, key=GRADES.index)


@dataclass(frozen=True, slots=True)
class Source:
    """A publication that a record, model or limit rests on.

    Parameters
    ----------
    key : str
        AuthorYear, the name of its file in ``data/sources``.
    citation : str
        Authors, title where known, journal, volume, year, pages.
    doi : str
        DOI without a resolver, empty where there is none.
    seen : str
        How the figures reached dropkit: the text itself, a table in another work, from memory.
    """

    key: str
    citation: str
    doi: str = ""
    seen: str = ""

    def __str__(self) -> str:
        doi = f" doi:{self.doi}" if self.doi else ""
        return f"{self.citation}{doi}"


@dataclass(frozen=True, slots=True)
class RecordUse:
    """One record that entered a result.

    Parameters
    ----------
    record : str
        Where it stands, such as ``"liquids/glycerol: viscosity 1"``.
    property : str
        The property that it gives.
    form : str
        The equation form.
    grade : Grade
        Its grade.
    sources : tuple of str
        Source keys.
    place : str
        Table, equation or page within the source.
    obtained : str
        ``"as published"`` or how it was fitted.
    range : str
        The stated range in words.
    uncertainty : float
        Relative standard uncertainty (k = 1).
    """

    record: str
    property: str
    form: str
    grade: Grade
    sources: tuple[str, ...]
    place: str
    obtained: str
    range: str
    uncertainty: float


@dataclass(frozen=True, slots=True)
class Trail:
    """How a value was made.

    Parameters
    ----------
    quantity : str
        What the value is.
    subject : str
        The liquid or mixture.
    method : str
        One line: the equation, mixing rule or engine.
    grade : Grade
        The worst grade of what entered.
    uncertainty : float or None
        Relative standard uncertainty (k = 1); None where none is stated.
    records : tuple of RecordUse
        The records that entered.
    assumptions, cautions : tuple of str
        What was taken for granted, and what the user should know.
    versions : dict
        Versions of dropkit, its data and any engine.
    """

    quantity: str
    subject: str
    method: str
    grade: Grade
    uncertainty: float | None = None
    records: tuple[RecordUse, ...] = ()
    assumptions: tuple[str, ...] = ()
    cautions: tuple[str, ...] = ()
    versions: dict[str, str] = field(default_factory=dict)

    @property
    def sources(self) -> tuple[str, ...]:
        """Keys of the sources that entered, each once."""
        return tuple(dict.fromkeys(key for record in self.records for key in record.sources))

    @property
    def range(self) -> str:
        """The stated ranges of the records that entered, in words."""
        return "; ".join(dict.fromkeys(record.range for record in self.records))

    def to_dict(self) -> dict[str, Any]:
        """A dict of plain types that survives JSON.

        Returns
        -------
        dict
            One entry per field.

        Examples
        --------
        >>> trail = Trail("density", "water", "polynomial", "measured", 0.001)
        >>> Trail.from_dict(trail.to_dict()) == trail
        True
        """
        return asdict(self)

    @classmethod
    def from_dict(cls, data: dict[str, Any]) -> Trail:
        """Rebuild a trail from `to_dict`, also after a passage through JSON.

        Parameters
        ----------
        data : dict
            What `to_dict` gave.

        Returns
        -------
        Trail
            Equal to the one that was written.
        """
        records = tuple(
            RecordUse(**{**record, "sources": tuple(record["sources"])})
            for record in data["records"]
        )
        tuples = {name: tuple(data[name]) for name in ("assumptions", "cautions")}
        return cls(**{**data, **tuples, "records": records})

    def __str__(self) -> str:
        spread = (
            "" if self.uncertainty is None else f", +-{2 * self.uncertainty:.2g} (95 %, relative)"
        )
        lines = [f"{self.quantity} of {self.subject}: {self.method} [{self.grade}{spread}]"]
        for record in self.records:
            keys = ", ".join(record.sources)
            lines.append(
                f"  {record.record} ({record.form}), {record.range}, {record.obtained}; "
                f"{keys}: {record.place} [{record.grade}]"
            )
        lines.extend(f"  assumed: {text}" for text in self.assumptions)
        lines.extend(f"  caution: {text}" for text in self.cautions)
        return "\n".join(lines)


def cite(*results: Any) -> str:
    """The publications that some results rest on, one per line.

    Parameters
    ----------
    *results
        Liquids, mixtures, states, gases, sheets of numbers, results of searches: anything
        with ``sources``; also source keys as strings.

    Returns
    -------
    str
        One line per source: key, citation, DOI, and how the figures were seen.

    Raises
    ------
    UnknownName
        For a source key without a record.
    BadInput
        For something that rests on no source.

    Examples
    --------
    >>> import dropkit as dk
    >>> "IAPWS" in dk.cite(dk.liquid("water"))
    True
    """
    # Imported here: records import this module for the types above.
    from dropkit.records import source

    keys: dict[str, None] = {}
    for result in results:
        found = (result,) if isinstance(result, str) else getattr(result, "sources", None)
        if found is None:
            raise BadInput(
                f"{type(result).__name__} has no sources to cite",
                allowed="liquids, mixtures, states, gases, results, or source keys as text",
            )
        keys.update(dict.fromkeys(found() if callable(found) else found))
    lines = []
    for key in keys:
        entry = source(key)
        seen = f" [seen: {entry.seen}]" if entry.seen else ""
        lines.append(f"{key}: {entry}{seen}")
    return "\n".join(lines)
