"""Records of numbers and states, and the one call that computes them, for one row or for many."""

from __future__ import annotations

import enum
from collections.abc import Iterator
from typing import Any, TypeVar, Union, get_args, get_origin, get_type_hints

import numpy as np
from numpy.typing import NDArray

from . import _core

__all__ = ["Array", "Record", "T", "choice", "run"]

Array = NDArray[np.float64]
Status = Union[int, NDArray[np.int32]]

#: float in the record of one row, a float64 array in a record of many.
T = TypeVar("T")

R = TypeVar("R")


class Record:
    """Base of streams and results: fields that do not change, floats for one row or arrays of one shape for many.

    Attributes
    ----------
    status : int or numpy.ndarray
        0 where the row has a result, else the code of the error; the fields of that row are then NaN.
    """

    __slots__ = ("__dict__", "__weakref__")

    #: Fields that make the record again; all by default.
    _inputs: tuple[str, ...] = ()

    @property
    def status(self) -> Status:
        return self.__dict__.get("_status", 0)  # type: ignore[no-any-return]

    @property
    def failed(self) -> int:
        """Number of rows without a result."""
        return int(np.count_nonzero(self.status))

    def __eq__(self, other: object) -> bool:
        if type(other) is not type(self):
            return NotImplemented
        ours, theirs = self.__dict__, other.__dict__
        return ours.keys() == theirs.keys() and all(_same(ours[name], theirs[name]) for name in ours)

    def __setstate__(self, state: dict[str, Any]) -> None:
        for value in state.values():
            _freeze(value)
        self.__dict__.update(state)


def _same(a: Any, b: Any) -> bool:
    if isinstance(a, (float, np.ndarray)):
        return bool(np.array_equal(a, b, equal_nan=True))
    return bool(a == b)


def _freeze(value: Any) -> Any:
    if isinstance(value, np.ndarray):
        value.flags.writeable = False
    return value


def choice(value: Any, names: dict[str, int], label: str) -> tuple[tuple[str, Any], tuple[str, Any]]:
    """A named choice or a number in its place, as the two arguments that the core reads."""
    if isinstance(value, str):
        if value not in names:
            allowed = " or ".join(repr(name) for name in names)
            raise ValueError(f"{label} must be {allowed}, or a number; not {value!r}")
        return (label, names[value]), (label, 0.0)
    return (label, 2), (label, value)


def expect(value: Any, kind: type, label: str) -> None:
    """Refuses an argument of another class with a message."""
    if not isinstance(value, kind):
        raise TypeError(f"{label} must be {kind.__name__}, not {type(value).__name__}")


def run(process: str, result: type[R], *arguments: tuple[str, Any]) -> R:
    """Runs a process of the core on named arguments and builds `result`, a class of records or `float`."""
    labels: list[str] = []
    values: list[Any] = []
    for label, value in arguments:
        _flatten(label, value, labels, values)
    kind: Any = result
    results, status = _core.run(process, _layout(kind), labels, values)
    _freeze(status)
    built: R = _build(result, iter(results), status)
    return built


def _flatten(label: str, value: Any, labels: list[str], values: list[Any]) -> None:
    if isinstance(value, Record):
        for name in value._inputs or tuple(value.__dataclass_fields__):  # type: ignore[attr-defined]
            _flatten(f"{label}.{name}", getattr(value, name), labels, values)
    else:
        labels.append(label)
        values.append(value)


def _fields(record: Any) -> dict[str, Any]:
    """What each field of a class of records is, read from its annotations once."""
    if record not in _FIELDS:
        hints = get_type_hints(record)
        _FIELDS[record] = {name: _kind(hints[name]) for name in record.__dataclass_fields__}
    return _FIELDS[record]


_FIELDS: dict[Any, dict[str, Any]] = {}
_LAYOUTS: dict[Any, str] = {}


def _kind(hint: Any) -> Any:
    if isinstance(hint, TypeVar):
        return float
    origin = get_origin(hint)
    # Unions are "one of a row, or an array of them": the first says what it is.
    return get_args(hint)[0] if origin is Union else origin or hint


def _layout(kind: Any) -> str:
    """A letter for each number and each state, in the order of the core."""
    if kind is _core.MoistAir:
        return "S"
    if not issubclass(kind, Record):
        return "N"
    if kind not in _LAYOUTS:
        _LAYOUTS[kind] = "".join(_layout(field) for field in _fields(kind).values())
    return _LAYOUTS[kind]


def _build(kind: Any, values: Iterator[Any], status: Status) -> Any:
    if issubclass(kind, Record):
        record = object.__new__(kind)
        parts = {name: _build(field, values, status) for name, field in _fields(kind).items()}
        record.__dict__.update(parts, _status=status)
        return record
    value = next(values)
    if kind is bool:
        return bool(value) if isinstance(value, float) else _freeze(value == 1.0)
    if issubclass(kind, enum.IntEnum):
        return kind(int(value)) if isinstance(value, float) else _freeze(_codes(value))
    return _freeze(value)


def _codes(values: Array) -> NDArray[np.int32]:
    """Codes of an enumeration; −1 where there is none."""
    return np.where(np.isnan(values), -1.0, values).astype(np.int32)
