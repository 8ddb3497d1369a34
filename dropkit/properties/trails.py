"""How trails of several properties become one."""

from __future__ import annotations

from collections.abc import Iterable, Sequence

import numpy as np

from dropkit import records
from dropkit.provenance import Grade, RecordUse, Trail, worst_grade
from dropkit.version import VERSION

__all__ = ["grade_with", "quotient_trail", "record_use", "relative_uncertainty", "versions"]


def versions(blocks: Iterable[records.PropertyRecord] = ()) -> dict[str, str]:
    """Versions of dropkit, its data, and any engine behind some records, for trails."""
    engines = {
        block.parameters["engine"]: block.parameters["version"]
        for block in blocks
        if "engine" in block.parameters
    }
    return {"dropkit": VERSION, "data": records.data_version(), **engines}


def record_use(block: records.PropertyRecord) -> RecordUse:
    """A record as it stands in a trail."""
    return RecordUse(
        record=block.label,
        property=block.property,
        form=block.form,
        grade=block.grade,
        sources=block.sources,
        place=block.place,
        obtained=block.obtained,
        range=str(block.range),
        uncertainty=relative_uncertainty(block, None),
    )


def relative_uncertainty(block: records.PropertyRecord, value: float | None) -> float:
    """Relative standard uncertainty of a record; of two that it states, the larger at a value."""
    if block.uncertainty_absolute is None:
        return block.uncertainty
    scale = value if value is not None else float(block.checks[0]["value"])
    return max(block.uncertainty, block.uncertainty_absolute / scale)


def grade_with(grades: Iterable[Grade]) -> Grade:
    """The grade of an own value that leans on records: the worst of all."""
    return worst_grade(["own", *grades])


def quotient_trail(parts: Sequence[Trail]) -> Trail:
    """The trail of kinematic viscosity from those of viscosity and density.

    Its uncertainty is unknown as soon as one of theirs is.
    """
    known = [part.uncertainty for part in parts if part.uncertainty is not None]
    return Trail(
        quantity="kinematic_viscosity",
        subject=parts[0].subject,
        method=f"viscosity over density ({'; '.join(dict.fromkeys(p.method for p in parts))})",
        grade=worst_grade(part.grade for part in parts),
        uncertainty=float(np.hypot.reduce(known)) if len(known) == len(parts) else None,
        records=tuple(record for part in parts for record in part.records),
        assumptions=tuple(dict.fromkeys(text for part in parts for text in part.assumptions)),
        cautions=tuple(dict.fromkeys(text for part in parts for text in part.cautions)),
        versions=parts[0].versions,
    )
