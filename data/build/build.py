"""Build data records from specs: ``python data/build/build.py [name ...]``; see README.md here."""

from __future__ import annotations

import sys
from pathlib import Path

from record_builder.command import main

if __name__ == "__main__":
    sys.exit(main(sys.argv[1:], Path(__file__).resolve().parents[1]))
