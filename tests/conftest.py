"""What every test run shares: no display, and hypothesis that gives the same run each time."""

from __future__ import annotations

import os

# Before anything imports matplotlib: tests, examples and docs never need a display.
os.environ["MPLBACKEND"] = "Agg"

from hypothesis import HealthCheck, settings

# No deadline anywhere: a time limit fails on a busy machine and says nothing about the code.
settings.register_profile("dev", deadline=None, print_blob=True)
# On CI the same examples are drawn in every run, so that a red run can be repeated at home:
# CI=true python -m pytest. Nothing is read from or written to an examples database.
settings.register_profile(
    "ci",
    deadline=None,
    derandomize=True,
    database=None,
    print_blob=True,
    # Data generation slows down with the machine; that is no fault of a test.
    suppress_health_check=[HealthCheck.too_slow],
)
settings.load_profile("ci" if os.environ.get("CI") else "dev")
