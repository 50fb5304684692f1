"""What NumPy does best: take anything that looks like numbers to contiguous columns of one shape."""

from __future__ import annotations

from collections.abc import Sequence
from typing import Any, Union

import numpy as np
from numpy.typing import NDArray

Column = Union[float, NDArray[np.float64]]


def numbers(name: str, value: Any) -> NDArray[np.float64]:
    """`value` as an aligned, C-contiguous float64 array; the same memory where it is one already. Masked is missing."""
    if isinstance(value, np.ma.MaskedArray):
        value = np.ma.filled(value.astype(np.float64), np.nan)
    try:
        array = np.asarray(value)
    except ValueError as error:  # rows of different lengths
        raise TypeError(f"{name} must be a number or an array of numbers: {error}") from None
    if array.dtype.kind not in "fiub":
        raise TypeError(f"{name} must be a number or an array of numbers, not {type(value).__name__} ({array.dtype})")
    # A view of the base class: a subclass could give `reshape` another meaning.
    return np.require(array.view(np.ndarray), np.float64, ["C", "A"])


def broadcast(names: Sequence[str], values: Sequence[Any]) -> tuple[tuple[int, ...], list[Column]]:
    """The common shape, and for each value a flat contiguous array of it, or a float where it is the same in all rows."""
    arrays = [numbers(name, value) for name, value in zip(names, values)]
    try:
        shape = np.broadcast_shapes(*(array.shape for array in arrays))
    except (ValueError, RuntimeError):  # the latter beyond the dimensions that NumPy broadcasts
        shapes = ", ".join(f"{name} {array.shape}" for name, array in zip(names, arrays) if array.ndim)
        raise ValueError(f"shapes do not match: {shapes}") from None
    return shape, [_spread(array, shape) for array in arrays]


def _spread(array: NDArray[np.float64], shape: tuple[int, ...]) -> Column:
    if array.size == 1:
        return array.item()
    # `broadcast_to` makes a view, `ascontiguousarray` copies only where that repeats something.
    return np.ascontiguousarray(np.broadcast_to(array, shape)).reshape(-1)


def copy_to(target: NDArray[Any], source: NDArray[np.float64]) -> None:
    """Copies a finished column; float32 and strided targets are fine, integers are not."""
    np.copyto(target, source, casting="same_kind")
