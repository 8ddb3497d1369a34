"""Dripping: the drop that falls from a tip, its size, its rate, and what it tells of the liquid.

One published model per file; every public function of the files is an attribute of this package.
"""

from __future__ import annotations

from dropkit.models.families import lazy_family

__getattr__, __dir__ = lazy_family(__name__)
