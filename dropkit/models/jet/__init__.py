"""Liquid jets: growth of waves, the drops they make, and how far the jet reaches.

One published model per file; every public function of the files is an attribute of this package.
"""

from __future__ import annotations

from dropkit.models.families import lazy_family

__getattr__, __dir__ = lazy_family(__name__)
