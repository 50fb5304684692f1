"""Readings with their uncertainty, and air as its sensors see it.

A *standard* uncertainty is one standard deviation. What a data sheet states as ±a is, unless it says otherwise, taken as equally
probable within: a/√3 (JCGM 100:2008, 4.3.7; `within`). Readings count as independent of each other.
"""

from __future__ import annotations

import math
from typing import Any, Union

import numpy as np
from numpy.typing import ArrayLike

from .._quantities import QUANTITIES
from .._rows import expect

__all__ = ["MeasuredAir", "Reading", "within"]


class Reading:
    """A reading or a column of them, the standard uncertainty in the same unit, and how far it can be trusted at all.

    Immutable.

    Parameters
    ----------
    value : float or array_like
        In the unit of the library; NaN when there is none.
    standard_uncertainty : float or array_like
        0 or more.
    quality : Quality, int or array_like
        A refused reading counts as missing, whatever its value is.

    Examples
    --------
    >>> from moistair.process.measured import Reading
    >>> Reading(24.0, standard_uncertainty=0.2)
    Reading(24.0, standard_uncertainty=0.2, quality=0)
    """

    __slots__ = ("quality", "standard_uncertainty", "value")

    value: ArrayLike
    standard_uncertainty: ArrayLike
    quality: ArrayLike

    def __init__(self, value: ArrayLike, *, standard_uncertainty: ArrayLike, quality: ArrayLike = 0) -> None:
        object.__setattr__(self, "value", value)
        object.__setattr__(self, "standard_uncertainty", standard_uncertainty)
        object.__setattr__(self, "quality", quality)

    def __setattr__(self, name: str, value: Any) -> None:
        raise AttributeError(f"{name} cannot be set")

    def __reduce__(self) -> tuple[Any, ...]:
        return _restored, (self.value, self.standard_uncertainty, self.quality)

    def __repr__(self) -> str:
        return (
            f"Reading({self.value!r}, standard_uncertainty={self.standard_uncertainty!r}, "
            f"quality={self.quality if isinstance(self.quality, np.ndarray) else _plain(self.quality)!r})"
        )


def _plain(quality: Any) -> Any:
    return int(quality) if isinstance(quality, int) else quality


def _restored(value: ArrayLike, standard_uncertainty: ArrayLike, quality: ArrayLike) -> Reading:
    return Reading(value, standard_uncertainty=standard_uncertainty, quality=quality)


def within(value: ArrayLike, half_width: float, *, quality: ArrayLike = 0) -> Reading:
    """A reading that is equally probable anywhere within ±`half_width`.

    Parameters
    ----------
    value : float or array_like
        In the unit of the library.
    half_width : float
        In the same unit.
    quality : Quality, int or array_like
        How far it can be trusted.

    Returns
    -------
    Reading

    Examples
    --------
    >>> from moistair.process.measured import within
    >>> round(within(24.0, 0.5).standard_uncertainty, 4)
    0.2887
    """
    return Reading(value, standard_uncertainty=half_width / math.sqrt(3.0), quality=quality)


class MeasuredAir:
    """Air as a temperature and a humidity sensor see it.

    Immutable.

    Parameters
    ----------
    dry_bulb : Reading
        °C.
    **humidity : Reading
        One quantity that fixes a state, by its name, such as `relative_humidity`; without any the temperature alone is measured.

    Examples
    --------
    >>> from moistair.process.measured import MeasuredAir, within
    >>> air = MeasuredAir(dry_bulb=within(24.0, 0.5), relative_humidity=within(0.5, 0.03))
    >>> air.humidity_quantity
    'relative_humidity'
    """

    __slots__ = ("dry_bulb", "humidity", "humidity_quantity")

    dry_bulb: Reading
    humidity: Reading
    humidity_quantity: str

    def __init__(self, *, dry_bulb: Reading, **humidity: Reading) -> None:
        expect(dry_bulb, Reading, "dry_bulb")
        if len(humidity) > 1:
            raise TypeError(f"one humidity at most, not {' and '.join(humidity)}")
        missing = Reading(math.nan, standard_uncertainty=0.0, quality=2)
        name, reading = next(iter(humidity.items()), ("relative_humidity", missing))
        if name not in QUANTITIES:
            raise TypeError(f"{name} is no quantity")
        expect(reading, Reading, name)
        object.__setattr__(self, "dry_bulb", dry_bulb)
        object.__setattr__(self, "humidity", reading)
        object.__setattr__(self, "humidity_quantity", name)

    def __setattr__(self, name: str, value: Any) -> None:
        raise AttributeError(f"{name} cannot be set")

    def __reduce__(self) -> tuple[Any, ...]:
        return _restored_air, (self.dry_bulb, self.humidity_quantity, self.humidity)

    def __repr__(self) -> str:
        return f"MeasuredAir(dry_bulb={self.dry_bulb!r}, {self.humidity_quantity}={self.humidity!r})"


def _restored_air(dry_bulb: Reading, name: str, humidity: Reading) -> MeasuredAir:
    return MeasuredAir(dry_bulb=dry_bulb, **{name: humidity})


def reading_parts(label: str, reading: Reading) -> list[tuple[str, Any]]:
    """A reading as arguments of the core."""
    expect(reading, Reading, label)
    parts = ("value", reading.value), ("standard_uncertainty", reading.standard_uncertainty), ("quality", reading.quality)
    return [(f"{label}.{name}", _number(value)) for name, value in parts]


def air_parts(label: str, air: MeasuredAir) -> list[tuple[str, Any]]:
    """Measured air as arguments of the core."""
    expect(air, MeasuredAir, label)
    readings = reading_parts(f"{label}.dry_bulb", air.dry_bulb) + reading_parts(f"{label}.humidity", air.humidity)
    return [*readings, (f"{label}.humidity_quantity", quantity_code(air.humidity_quantity))]


def quantity_code(name: Union[str, int]) -> int:
    """The code of a quantity by its name."""
    if name not in QUANTITIES:
        raise ValueError(f"{name!r} is no quantity")
    return QUANTITIES[str(name)].code


def _number(value: Any) -> Any:
    return int(value) if isinstance(value, int) else value
