"""Whether heat and water close over a process, recomputed from what enters, what leaves and what was exchanged."""

from __future__ import annotations

from collections.abc import Sequence
from dataclasses import dataclass
from typing import Any, Generic, Union

import numpy as np
from numpy.typing import NDArray

from .._rows import Record, T, expect, run
from ._streams import AirStream, Exchange, WetStream, wet, wet_all

__all__ = ["Books", "balance"]


@dataclass(frozen=True, eq=False, init=False)
class Books(Record, Generic[T]):
    """The two books of a process: what is left over, and what it is measured against.

    Attributes
    ----------
    heat_residual : float or numpy.ndarray
        Heat out − in − exchanged, W; zero if the book closes.
    heat_scale : float or numpy.ndarray
        Sum of the magnitudes of all sensible and latent terms and of the water's enthalpy, W.
    water_residual : float or numpy.ndarray
        Water out − in − exchanged, kg/s.
    water_scale : float or numpy.ndarray
        Sum of the magnitudes of all water terms, kg/s.
    heat_resolution : float or numpy.ndarray
        What one unit in the last place of the outlet's temperature is worth, W.
    close : bool or numpy.ndarray
        Whether both close to rounding: 8 ε of the scale, and the resolution of the outlet's temperature.
    """

    heat_residual: T
    heat_scale: T
    water_residual: T
    water_scale: T
    heat_resolution: T
    close: Union[bool, NDArray[np.bool_]]


def balance(
    entering: Sequence[Union[AirStream[T], WetStream[T]]],
    *,
    leaving: Union[AirStream[T], WetStream[T]],
    exchange: Exchange[T],
) -> Books[T]:
    """Balances streams that enter against one that leaves.

    Enthalpies are computed anew from temperature, pressure and humidity ratio, not taken from the process.

    Parameters
    ----------
    entering : sequence of AirStream or WetStream
        The streams that enter.
    leaving : AirStream or WetStream
        The stream that leaves.
    exchange : Exchange
        What the process says that it gave to the air.

    Returns
    -------
    Books

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, books, sensible
    >>> air = MoistAir(dry_bulb=5.0, relative_humidity=0.7, pressure=101_325.0)
    >>> entering = AirStream(air, dry_air_flow=1.0)
    >>> heater = sensible.with_heat(entering, heat=20_000.0)
    >>> books.balance([entering], leaving=heater.leaving, exchange=heater.exchange).close
    True
    """
    expect(exchange, Exchange, "exchange")
    return run(
        "books.balance",
        Books,
        ("exchange", exchange),
        ("leaving", wet(leaving, "leaving")),
        *wet_all(entering, "entering"),
    )
