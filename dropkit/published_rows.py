"""The rows of a file of published points, with what it leaves out filled in.

``data/README.md`` says how such files look. A long one says in a comment line that its empty
cells are as in the row above, so that a liquid, a property and a doi are written once.
"""

from __future__ import annotations

import csv
import re
from collections.abc import Iterable, Sequence
from pathlib import Path
from typing import Final

from dropkit.errors import RecordError

__all__ = ["ABSENT", "MARK", "VALUE", "filled_rows", "is_mark", "mark_of", "published_file"]

# The comment line, and how a row under it says that it has no doi.
MARK: Final = "# empty cells: as in the row above"
ABSENT: Final = "none"
# Never left out: it is what the row is there for.
VALUE: Final = "value"
_MARK: Final = re.compile(r"# empty cells(?: of (?P<columns>[\w, ]+))?: as in the row above\s*")


def mark_of(columns: Sequence[str]) -> str:
    """The comment line of a file in which only some columns leave out what repeats.

    Examples
    --------
    >>> mark_of(["file", "reason"])
    '# empty cells of file, reason: as in the row above'
    """
    return MARK.replace(":", f" of {', '.join(columns)}:")


def is_mark(line: str) -> bool:
    """Whether a line says that empty cells repeat the row above.

    Examples
    --------
    >>> is_mark(MARK), is_mark("# note: empty cells were not measured")
    (True, False)
    """
    return _MARK.fullmatch(line) is not None


def filled_rows(lines: Iterable[str], name: str = "") -> list[dict[str, str]]:
    """Rows of a file of published points, every cell filled.

    Lines that begin with ``#`` and empty lines are passed over. Only where one of them is `MARK`,
    or what `mark_of` gives, do empty cells (of the columns that it names) stand for those of the
    row above.

    Parameters
    ----------
    lines : iterable of str
        The lines of the file.
    name : str, optional
        Name of the file, for the message of an error.

    Returns
    -------
    list of dict
        One for each row, by column; a row of another length than the header has None in it.

    Raises
    ------
    RecordError
        If the first row under the mark leaves such a cell out, or any row its value.

    Examples
    --------
    >>> text = "liquid,T_K,value,doi\\nwater,293.15,998.2,none\\n,298.15,997.0,\\n"
    >>> filled_rows([MARK, *text.splitlines()])[1]
    {'liquid': 'water', 'T_K': '298.15', 'value': '997.0', 'doi': ''}
    """
    body, mark = [], None
    for line in lines:
        if line.startswith("#"):
            mark = mark or _MARK.fullmatch(line)
        elif line.strip():
            body.append(line)
    rows = list(csv.DictReader(body))
    if mark is None or not rows:
        return rows
    named = mark["columns"]
    filled = [part.strip() for part in named.split(",")] if named else list(rows[0])
    above: dict[str, str] = {}
    for number, row in enumerate(rows, 1):
        for column in filled:
            if row.get(column) != "":
                continue
            if column == VALUE or not above.get(column):
                raise RecordError(
                    f"published/{name}, row {number}: the column {column} is empty",
                    allowed=f"empty cells as in the row above; '{ABSENT}' where there is no doi",
                )
            row[column] = above[column]
        above.update((column, cell) for column, cell in row.items() if cell)
    for row in rows:
        if row.get("doi") == ABSENT:
            row["doi"] = ""
    return rows


def published_file(path: Path, name: str = "") -> list[dict[str, str]]:
    """Rows of one file, as `filled_rows` reads them.

    Parameters
    ----------
    path : Path
        The file.
    name : str, optional
        What an error calls it; by default the file's name without ``.csv``.

    Returns
    -------
    list of dict
        One for each row, by column.
    """
    with path.open(encoding="utf-8", newline="") as lines:
        return filled_rows(lines, name or path.stem)
