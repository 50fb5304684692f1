"""Records of numbers and states, and the one call that computes them, for one row or for many."""

from __future__ import annotations

import enum
from collections.abc import Callable, Iterator
from typing import Any, Optional, TypeVar, Union, get_args, get_origin, get_type_hints

import numpy as np
from numpy.typing import NDArray

from . import _core

__all__ = ["Array", "Record", "T", "choice", "run", "run_sequence"]

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
        """0 where the row has a result, else the code of the error: see `MoistAir.status`."""
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
    if type(value) is np.ndarray:
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
    """Runs a process of the core on named arguments and builds `result`, a class of records or `float`. `formulation`, a code, is that of
    arguments that come without a state."""
    labels: list[str] = []
    values: list[Any] = []
    formulation = 0
    for label, value in arguments:
        if label == "formulation":
            formulation = value
        elif isinstance(value, Record):
            _take_apart(label, value, labels, values)
        else:
            labels.append(label)
            values.append(value)
    layout, build = _plan(result)
    results, status = _core.run(process, layout, labels, values, formulation)
    built: R = build(iter(results), _freeze(status))
    return built


def run_sequence(
    kinds: list[int],
    results: list[Any],
    arguments: list[tuple[str, Any]],
    wanted: Optional[tuple[int, int, int, int]] = None,
) -> list[Any]:
    """Runs a chain of steps of the core and builds `results`, classes of records, one after the other."""
    labels: list[str] = []
    values: list[Any] = []
    for label, value in arguments:
        if isinstance(value, Record):
            _take_apart(label, value, labels, values)
        else:
            labels.append(label)
            values.append(value)
    plans = [_plan(result) for result in results]
    layout = "".join(layout for layout, _ in plans)
    found, status = _core.run_sequence(kinds, layout, labels, values, wanted)
    each, status = iter(found), _freeze(status)
    return [build(each, status) for _, build in plans]


def _take_apart(label: str, record: Any, labels: list[str], values: list[Any]) -> None:
    for name in record._inputs or record.__dataclass_fields__:
        value = getattr(record, name)
        if isinstance(value, Record):
            _take_apart(f"{label}.{name}", value, labels, values)
        else:
            labels.append(f"{label}.{name}")
            values.append(value)


# How a result is built from the values of the core: a letter for each of them, and a function that takes as many.
Build = Callable[[Iterator[Any], Status], Any]
_PLANS: dict[Any, tuple[str, Build]] = {}


def _plan(kind: Any) -> tuple[str, Build]:
    if kind not in _PLANS:
        _PLANS[kind] = _make_plan(kind)
    return _PLANS[kind]


def _make_plan(kind: Any) -> tuple[str, Build]:
    if kind is _core.MoistAir:
        return "S", lambda values, _: next(values)
    if kind is bool:
        return "N", lambda values, _: _truth(next(values))
    if kind is int:
        return "N", lambda values, _: _whole(next(values))
    if issubclass(kind, enum.IntEnum):
        return "N", lambda values, _: _member(kind, next(values))
    if not issubclass(kind, Record):
        return "N", lambda values, _: _freeze(next(values))
    record: Any = kind
    hints = get_type_hints(record)
    plans = {name: _plan(_kind(hints[name])) for name in record.__dataclass_fields__}
    fields = [(name, build) for name, (_, build) in plans.items()]

    def build(values: Iterator[Any], status: Status) -> Any:
        made = object.__new__(record)
        parts = made.__dict__
        for name, part in fields:
            parts[name] = part(values, status)
        parts["_status"] = status
        return made

    return "".join(layout for layout, _ in plans.values()), build


def _kind(hint: Any) -> Any:
    """What an annotation of a field stands for."""
    if isinstance(hint, TypeVar):
        return float
    origin = get_origin(hint)
    # Unions are "one of a row, or an array of them": the first says what it is.
    return get_args(hint)[0] if origin is Union else origin or hint


def _truth(value: Any) -> Any:
    return value == 1.0 if isinstance(value, float) else _freeze(value == 1.0)


def _whole(value: Any) -> Any:
    return int(value) if isinstance(value, float) else _freeze(_codes(value))


def _member(kind: Any, value: Any) -> Any:
    return kind(int(value)) if isinstance(value, float) else _freeze(_codes(value))


def _codes(values: Array) -> NDArray[np.int32]:
    """Codes of an enumeration; −1 where there is none."""
    return np.where(np.isnan(values), -1.0, values).astype(np.int32)
