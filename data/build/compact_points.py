"""Write long files of published points short: cells that repeat the row above are left out.

    python data/build/compact_points.py [--check] [FILE ...]

Without names: every long file of liquids, mixtures and interfaces in `data/published`, and the
list of excluded points. The rows are sorted so that repeats adjoin; what was written of each number
stays as it was, and a short file stays as it is. `--check` writes nothing and ends with 1 where a
file is not as this would leave it. `dropkit.published_rows` reads both forms, so other files may be
named once nothing reads them in another way.
"""

from __future__ import annotations

import csv
import io
import sys
from collections.abc import Sequence
from pathlib import Path

from dropkit.published_rows import ABSENT, MARK, VALUE, filled_rows, is_mark, mark_of

__all__ = ["LEAST", "compact", "compacted", "main"]

PUBLISHED = Path(__file__).resolve().parents[1] / "published"
FOLDERS = ("liquids", "mixtures", "interfaces")
# Bytes of a file below which the full rows stay: they are easier to add to by hand.
LEAST = 1500
# What a row is about. It is sorted by these and by its origin; rows that agree keep their order.
# One of these is written out after another that changed, so that a new subject begins whole.
SUBJECT = (
    *("file", "liquid", "component_1", "component_2", "liquid_1", "liquid_2"),
    *("property", "basis"),
)
SORTED_BY = (*SUBJECT, "doi", "reason", "contradicting_source")
# What the list of excluded points leaves out; an empty cell of its other columns has a meaning.
EXCLUDED = ("file", "component_1", "property", "reason", "contradicting_source")


def _left_out(rows: list[dict[str, str]]) -> tuple[list[str], str]:
    """Columns that leave out what repeats, and the comment line that says so."""
    columns = list(rows[0])
    if "reason" in columns:
        return list(EXCLUDED), mark_of(EXCLUDED)
    if VALUE in columns:
        return [column for column in columns if column != VALUE], MARK
    # Of any other table those columns in which every row says something.
    filled = [column for column in columns if all(row[column] for row in rows)]
    return filled, mark_of(filled)


def compacted(text: str, name: str = "") -> str:
    """A file in the short form, whichever form it has.

    Raises
    ------
    ValueError
        If a row is not as long as the header, or a cell can't be told from one left out.
    """
    lines = text.splitlines(keepends=True)
    head = [line.rstrip("\r\n") for line in lines if line.startswith("#")]
    rows = filled_rows(lines, name)
    if not rows:
        return text
    columns = list(rows[0])
    for number, row in enumerate(rows, 1):
        if None in row or None in row.values():
            raise ValueError(f"{name}, row {number}: has another number of cells than the header")
        if row.get("doi") == ABSENT:
            raise ValueError(f"{name}, row {number}: the doi is '{ABSENT}'")
        if "doi" in row:
            row["doi"] = row["doi"] or ABSENT
    shorter, mark = _left_out(rows)
    for number, row in enumerate(rows, 1):
        empty = [column for column in shorter if not row[column]]
        if empty:
            raise ValueError(f"{name}, row {number}: the column {empty[0]} is empty")
    if mark == MARK or mark == mark_of(EXCLUDED):
        by = [column for column in SORTED_BY if column in columns]
        rows.sort(key=lambda row: [row[column] for column in by])
    out = io.StringIO()
    comments = [line for line in head if not is_mark(line)]
    out.writelines(f"{line}\n" for line in [*comments, mark])
    writer = csv.writer(out, lineterminator="\n")
    writer.writerow(columns)
    above: dict[str, str] = {}
    subject = [column for column in SUBJECT if column in columns]
    for row in rows:
        repeats = {c for c in shorter if above.get(c) == row[c]}
        new = next((i for i, c in enumerate(subject) if above.get(c) != row[c]), len(subject))
        repeats.difference_update(subject[new:])
        writer.writerow("" if column in repeats else cell for column, cell in row.items())
        above = row
    return out.getvalue()


def wanted(path: Path) -> str:
    """What a file should hold: short where it is long, or short already."""
    text = path.read_text(encoding="utf-8")
    short = any(map(is_mark, text.splitlines())) or len(text.encode()) > LEAST
    return compacted(text, path.stem) if short else text


def compact(path: Path) -> bool:
    """Bring a file into the form it should have; whether it was in another."""
    text = wanted(path)
    if text == path.read_text(encoding="utf-8"):
        return False
    path.write_text(text, encoding="utf-8", newline="\n")
    return True


def main(arguments: Sequence[str], published: Path = PUBLISHED) -> int:
    check = "--check" in arguments
    names = [Path(name) for name in arguments if name != "--check"]
    places = [f"{folder}/*.csv" for folder in FOLDERS] + ["excluded.csv"]
    paths = names or [path for place in places for path in sorted(published.glob(place))]
    bad = 0
    for path in paths:
        if check:
            if wanted(path) != path.read_text(encoding="utf-8"):
                bad += 1
                print(f"{path.parent.name}/{path.name} is not in the short form")
        elif compact(path):
            print(f"{path.parent.name}/{path.name}: {path.stat().st_size} bytes")
    if bad:
        print("run: python data/build/compact_points.py")
    return 1 if bad else 0


if __name__ == "__main__":
    sys.exit(main(sys.argv[1:]))
