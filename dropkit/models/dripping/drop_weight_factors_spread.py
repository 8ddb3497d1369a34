"""The published curves of the drop weight factor side by side."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any, Final

import numpy as np

from dropkit.models.dripping._factors import CURVES, statement
from dropkit.models.dripping.drop_weight_share_polynomial import drop_weight_factor_polynomial
from dropkit.models.dripping.drop_weight_share_power import drop_weight_factor_power
from dropkit.models.dripping.drop_weight_share_quadratic import drop_weight_factor_quadratic
from dropkit.models.dripping.drop_weight_share_table import drop_weight_factor
from dropkit.models.published import Published

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["drop_weight_factors_compared"]

MODEL: Final[Published] = statement(
    "the published curves of the drop weight factor, and their spread",
    place="psi of Harkins & Brown, Heertjes et al., Lee et al., Yildirim et al.",
)


def drop_weight_factors_compared(tip_ratio: Any) -> pd.DataFrame:
    """Shares of the ideal drop weight by every published curve, with their spread.

    Holds for slow drops of thin liquids. A curve is empty (NaN) where its own range ends.

    Parameters
    ----------
    tip_ratio : float or array
        Radius of the tip over the cube root of the volume of the fallen drop [-].

    Returns
    -------
    pandas.DataFrame
        One row per ratio: ``table`` (Harkins & Brown), ``quadratic`` (Heertjes et al.),
        ``polynomial`` (Lee, Chan & Pogaku), ``power`` (Yildirim, Xu & Basaran) and ``spread``, the
        largest less the smallest over the table's.

    Raises
    ------
    UnitError, Unphysical
        For what is no positive number.

    Examples
    --------
    >>> from dropkit.models import dripping
    >>> table = dripping.drop_weight_factors_compared([0.2, 0.5, 0.9])
    >>> table["spread"].round(3).tolist()
    [0.048, 0.009, 0.005]
    """
    import pandas as pd

    functions = {
        "table": drop_weight_factor,
        "quadratic": drop_weight_factor_quadratic,
        "polynomial": drop_weight_factor_polynomial,
        "power": drop_weight_factor_power,
    }
    columns = {
        word: np.atleast_1d(np.asarray(functions[word](tip_ratio, outside="nan"))).ravel()
        for word in CURVES
    }
    index = np.atleast_1d(np.asarray(getattr(tip_ratio, "magnitude", tip_ratio), dtype=float))
    found = pd.DataFrame(columns, index=pd.Index(index.ravel(), name="tip_ratio"))
    found["spread"] = (found.max(axis=1) - found.min(axis=1)) / found["table"]
    return found
