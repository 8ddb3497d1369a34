"""CoolProp and thermo, asked by CAS number for what dropkit's own records lack.

For use inside dropkit. Only named methods that rest on data, only the saturated liquid, only within
stated limits; what is known to be wrong for a chemical is left out (`known_faults`). The first
question to CoolProp takes a second, because it is imported then.

Examples
--------
>>> from dropkit.properties.engines import engine_curve
>>> curve = engine_curve("110-82-7", "density")  # cyclohexane
>>> round(curve.scalar(298.15), 1)
773.9
"""

from __future__ import annotations

from dropkit.properties.engines.engine_choice import (
    engine_boiling_point,
    engine_curve,
    engine_curves,
    engine_properties,
)
from dropkit.properties.engines.engine_records import (
    engine_blocks,
    engine_bodies,
    engine_liquid,
    why_not,
    why_nothing,
)
from dropkit.properties.engines.engine_types import EngineCurve, check_cas

__all__ = [
    "EngineCurve",
    "check_cas",
    "engine_blocks",
    "engine_bodies",
    "engine_boiling_point",
    "engine_curve",
    "engine_curves",
    "engine_liquid",
    "engine_properties",
    "why_nothing",
    "why_not",
]
