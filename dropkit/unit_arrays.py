"""Numbers, arrays and Series as they come in, turned into float64."""

from __future__ import annotations

import sys
from numbers import Real
from typing import Any, Final

import numpy as np

from dropkit.unit_errors import bad_form
from dropkit.unit_table import Kind

__all__ = ["float_array", "float_series", "is_real", "is_series"]

ARRAYS_OF: Final = {
    "b": "booleans", "c": "complex numbers", "U": "text", "S": "text", "T": "text",
    "O": "objects", "M": "dates", "m": "time spans", "V": "records",
}  # fmt: skip


def is_of(value: Any, module: str, name: str) -> bool:
    """Whether a value is of a class whose module need not be loaded to know that it is not."""
    loaded = sys.modules.get(module)
    return loaded is not None and isinstance(value, getattr(loaded, name, ()))


def is_real(value: Any) -> bool:
    """Whether a value is a real scalar; numpy counts time spans among the integers."""
    if isinstance(value, Real):
        return not isinstance(value, np.timedelta64)
    return is_of(value, "decimal", "Decimal")


def is_series(value: Any) -> bool:
    """Whether a value is a pandas Series."""
    return is_of(value, "pandas", "Series")


def float_array(value: np.ndarray[Any, Any], kind: Kind) -> Any:
    """A float64 array, or a float for a 0-d one."""
    if isinstance(value, np.ma.MaskedArray):
        if np.ma.is_masked(value):
            raise bad_form(
                "masked elements have no value", kind, "Fill them with NaN: x.filled(nan)"
            )
        value = value.data
    letter = value.dtype.kind
    if letter not in "fiu":
        hint = "Text with units goes into a list, ['60 um', '70 um']" if letter in "UTSO" else ""
        raise bad_form(f"the array holds {ARRAYS_OF.get(letter, value.dtype.name)}", kind, hint)
    with np.errstate(over="ignore"):  # of a longer float; infinity is refused later
        result = np.asarray(value, dtype=np.float64)
    return result if result.ndim else float(result)


def float_series(value: Any, kind: Kind) -> Any:
    """A Series as float64 with its index; missing values become NaN."""
    import pandas as pd

    if value.dtype == np.float64:
        return value
    kinds = pd.api.types
    if not kinds.is_numeric_dtype(value.dtype) or (
        kinds.is_bool_dtype(value.dtype) or kinds.is_complex_dtype(value.dtype)
    ):
        raise bad_form(f"the Series holds {value.dtype}", kind, "Convert it to SI numbers first")
    numbers = value.to_numpy(dtype=np.float64, na_value=np.nan)
    return pd.Series(numbers, index=value.index, name=value.name)
