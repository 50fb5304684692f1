"""Partial derivatives of a property."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Generic

from ._rows import Record, T

__all__ = ["PropertyDerivatives"]


@dataclass(frozen=True, eq=False)
class PropertyDerivatives(Record, Generic[T]):
    """A property and its partial derivatives, each while the other two inputs stay. Made by `MoistAir.derivatives`.

    Attributes
    ----------
    value : float or numpy.ndarray
        The property, bit for bit as the attribute of the state.
    by_dry_bulb : float or numpy.ndarray
        Per kelvin of dry bulb.
    by_second : float or numpy.ndarray
        Per unit of the second property.
    by_pressure : float or numpy.ndarray
        Per pascal.
    """

    value: T
    by_dry_bulb: T
    by_second: T
    by_pressure: T


PropertyDerivatives.__module__ = "moistair"
