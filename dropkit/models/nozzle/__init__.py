"""Nozzles: what pressure drives which flow, and the jet that comes out.

Pressures are gauge: above the pressure of the surroundings. One published model per file; every
public function of the files is an attribute of this package. A jet driven by high pressure can
pierce skin: such an injury is a medical emergency, however small it looks.
"""

from __future__ import annotations

from dropkit.models.families import lazy_family

__getattr__, __dir__ = lazy_family(__name__)
