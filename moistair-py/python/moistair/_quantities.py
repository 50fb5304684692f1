"""The table of quantities: names, units, limits."""

from __future__ import annotations

from collections.abc import Mapping
from types import MappingProxyType
from typing import NamedTuple

from ._core import quantity_table

__all__ = ["PROPERTIES", "QUANTITIES", "Quantity"]


class Quantity(NamedTuple):
    """A quantity, its unit on this face, and the range that an input of it may have with the real and the ideal gas.

    `limits` gives the range with any formulation.

    Examples
    --------
    >>> import moistair
    >>> moistair.QUANTITIES["pressure"]
    Quantity(name='pressure', code=1, unit='Pa', minimum=20000.0, maximum=1100000.0)
    """

    name: str
    code: int
    unit: str
    minimum: float
    maximum: float


_TABLE = quantity_table()

#: Every quantity by its name; the core reads the same table.
QUANTITIES: Mapping[str, Quantity] = MappingProxyType({row[0]: Quantity(*row[:5]) for row in _TABLE})

#: Names of the properties of a state, which are attributes of `MoistAir`.
PROPERTIES: tuple[str, ...] = tuple(row[0] for row in _TABLE if row[5])

Quantity.__module__ = "moistair"
