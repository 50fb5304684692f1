"""Exceptions: one base, one class for each thing that can be wrong."""

from __future__ import annotations

from typing import Any, Optional

__all__ = [
    "InfeasibleError",
    "MoistAirError",
    "NoValueError",
    "NotFiniteError",
    "OutOfRangeError",
    "ProcessError",
    "UnattainableError",
    "UndeterminedError",
    "UnknownNameError",
]


class MoistAirError(ValueError):
    """Base of all errors of this package.

    Attributes
    ----------
    code : int
        Stable number of the error, the same as on the C face and in ``status`` arrays.
    quantity : str or None
        Name of the quantity at fault.
    value : float or None
        Its value.
    minimum, maximum : float or None
        The limits that it breaks, in the unit of the quantity (see `moistair.QUANTITIES`).

    Examples
    --------
    >>> import moistair
    >>> try:
    ...     moistair.MoistAir(dry_bulb=34.0, relative_humidity=38.0, pressure=101325.0)
    ... except moistair.MoistAirError as error:
    ...     print(error.code, error.quantity, error.value, error.maximum)
    202 relative_humidity 38.0 1.6
    """

    code: int
    quantity: Optional[str]
    value: Optional[float]
    minimum: Optional[float]
    maximum: Optional[float]

    def __init__(
        self,
        message: str,
        code: int = 0,
        quantity: Optional[str] = None,
        value: Optional[float] = None,
        minimum: Optional[float] = None,
        maximum: Optional[float] = None,
    ) -> None:
        super().__init__(message)
        self.code = code
        self.quantity = quantity
        self.value = value
        self.minimum = minimum
        self.maximum = maximum

    def __reduce__(self) -> Any:
        parts = (self.args[0], self.code, self.quantity, self.value, self.minimum, self.maximum)
        return type(self), parts


class UnknownNameError(MoistAirError):
    """A name that is no property of a state."""


class NotFiniteError(MoistAirError):
    """An input is NaN or infinite."""


class OutOfRangeError(MoistAirError):
    """An input lies outside the declared range of its quantity."""


class UnattainableError(MoistAirError):
    """An input is in its range, but no state has it at this dry bulb and pressure, or beside the other property."""


class UndeterminedError(MoistAirError):
    """Two properties that fix no state together, or only badly; the message says why."""


class NoValueError(MoistAirError):
    """The state is valid, but this property has no meaning there."""


class ProcessError(MoistAirError):
    """Streams that cannot be combined, or a process on no air at all."""


class InfeasibleError(ProcessError):
    """A process cannot do what was asked; the limits that bind it are in the attributes."""


_CLASSES: dict[int, type[MoistAirError]] = {
    102: UnknownNameError,
    201: NotFiniteError,
    202: OutOfRangeError,
    203: UnattainableError,
    205: ProcessError,
    206: ProcessError,
    207: ProcessError,
    209: UndeterminedError,
    210: UnattainableError,
    211: ProcessError,
    301: InfeasibleError,
}


def from_parts(code: int, message: str, *details: Any) -> MoistAirError:
    """The exception of a code of the core."""
    kind = NoValueError if 310 <= code < 320 else _CLASSES.get(code, MoistAirError)
    return kind(message, code, *details)


for _class in (MoistAirError, *MoistAirError.__subclasses__(), InfeasibleError):
    _class.__module__ = "moistair"
