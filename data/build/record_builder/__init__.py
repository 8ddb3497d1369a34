"""The offline builder: published points and specs in, data records and residuals out.

Not part of the installed package. `build.py` beside this folder is its command.
"""

from __future__ import annotations


class BuildError(Exception):
    """A spec that cannot be built: unreadable, incomplete, or without the data it names."""


class Refused(BuildError):
    """A fit that the data do not bear: a second source disagrees, or the fit is ill-posed."""
