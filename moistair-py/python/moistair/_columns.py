"""What NumPy does best: take anything that looks like numbers to contiguous columns of one shape."""

from __future__ import annotations

import sys
from collections.abc import Sequence
from itertools import combinations
from typing import Any, Union

import numpy as np
from numpy.typing import NDArray

Column = Union[float, NDArray[np.float64]]

_TEXT = "; turn it into floats first, with NaN where a reading is missing (pandas.to_numeric does)"
_TIME = "; count seconds from a fixed instant, as (time - start) / numpy.timedelta64(1, 's') does"

#: What helps, by the kind of what came in place of numbers.
_ADVICE = {"O": _TEXT, "T": _TEXT, "U": _TEXT, "S": _TEXT, "M": _TIME, "m": _TIME}


def numbers(name: str, value: Any) -> NDArray[np.float64]:
    """`value` as an aligned, C-contiguous float64 array; the same memory where it is one already. Masked is missing."""
    if isinstance(value, np.ma.MaskedArray):
        value = np.ma.filled(value.astype(np.float64), np.nan)
    try:
        array = np.asarray(value)
    except ValueError as error:  # rows of different lengths
        raise TypeError(f"{name} must be a number or an array of numbers: {error}") from None
    if array.dtype.kind not in "fiub":
        raise TypeError(
            f"{name} must be a number or an array of numbers, not {type(value).__name__} ({array.dtype})"
            f"{_ADVICE.get(array.dtype.kind, '')}"
        )
    # A view of the base class: a subclass could give `reshape` another meaning.
    return np.require(array.view(np.ndarray), np.float64, ["C", "A"])


def broadcast(names: Sequence[str], values: Sequence[Any]) -> tuple[tuple[int, ...], list[Column]]:
    """The common shape, and for each value a flat contiguous array of it, or a float where it is the same in all rows."""
    arrays = [numbers(name, value) for name, value in zip(names, values)]
    _refuse_other_labels(names, values)
    try:
        shape = np.broadcast_shapes(*(array.shape for array in arrays))
    except (ValueError, RuntimeError):  # the latter beyond the dimensions that NumPy broadcasts
        shapes = ", ".join(f"{name} {array.shape}" for name, array in zip(names, arrays) if array.ndim)
        raise ValueError(f"shapes do not match: {shapes}") from None
    return shape, [_spread(array, shape) for array in arrays]


def _refuse_other_labels(names: Sequence[str], values: Sequence[Any]) -> None:
    """Rows are paired by position; pandas pairs them by label: where that is not the same, nobody should have to guess."""
    pandas = sys.modules.get("pandas")  # never imported from here
    if pandas is None:
        return
    labeled = [pair for pair in zip(names, values) if isinstance(pair[1], (pandas.Series, pandas.DataFrame))]
    for (name, value), (other_name, other) in combinations(labeled, 2):
        for labels, other_labels in zip(reversed(value.axes), reversed(other.axes)):
            # Different lengths are a matter of shapes.
            if len(labels) == len(other_labels) and not labels.equals(other_labels):
                raise ValueError(
                    f"{name} and {other_name} have different labels; align them first, or pair them by position with "
                    "to_numpy()"
                )


def _spread(array: NDArray[np.float64], shape: tuple[int, ...]) -> Column:
    if array.size == 1:
        return array.item()
    # `broadcast_to` makes a view, `ascontiguousarray` copies only where that repeats something.
    return np.ascontiguousarray(np.broadcast_to(array, shape)).reshape(-1)


def copy_to(target: NDArray[Any], source: NDArray[np.float64]) -> None:
    """Copies a finished column; float32 and strided targets are fine, integers are not."""
    np.copyto(target, source, casting="same_kind")
