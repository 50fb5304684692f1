"""Heating and cooling at constant humidity ratio."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Generic, overload

from numpy.typing import ArrayLike

from .._rows import Array, Record, T, expect, run
from ._streams import AirStream, Exchange

__all__ = ["Sensible", "to_temperature", "with_heat"]


@dataclass(frozen=True, eq=False, init=False)
class Sensible(Record, Generic[T]):
    """Leaving stream and exchange of a process without water.

    Attributes
    ----------
    leaving : AirStream
        The air that leaves.
    exchange : Exchange
        Heat into the air, W; no water.
    """

    leaving: AirStream[T]
    exchange: Exchange[T]


@overload
def to_temperature(entering: AirStream[float], *, leaving_temperature: float) -> Sensible[float]: ...
@overload
def to_temperature(entering: AirStream[Any], *, leaving_temperature: ArrayLike) -> Sensible[Array]: ...
def to_temperature(entering: AirStream[Any], *, leaving_temperature: ArrayLike) -> Sensible[Any]:
    """Heats or cools to a temperature: Q = ṁ (h₂ − h₁), W₂ = W₁.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    leaving_temperature : float or array_like
        Dry bulb that leaves, °C.

    Returns
    -------
    Sensible

    Raises
    ------
    InfeasibleError
        The air would be cooled past saturation: use `coil` there. The limits are then the dew or frost point and the
        range of states.
    NotFiniteError, OutOfRangeError
        The temperature.

    Examples
    --------
    10 m³/s saturated at 2 °C to 40 °C; ASHRAE Fundamentals 2021 ch. 1, Example 2, has 490 kW from rounded values of its table.

    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, sensible
    >>> air = MoistAir(dry_bulb=2.0, relative_humidity=1.0, pressure=101_325.0)
    >>> entering = AirStream.from_volume_flow(air, volume_flow=10.0)
    >>> heater = sensible.to_temperature(entering, leaving_temperature=40.0)
    >>> round(heater.exchange.heat / 1000.0)
    491
    """
    expect(entering, AirStream, "entering")
    return run(
        "sensible.to_temperature", Sensible, ("entering", entering), ("leaving_temperature", leaving_temperature)
    )


@overload
def with_heat(entering: AirStream[float], *, heat: float) -> Sensible[float]: ...
@overload
def with_heat(entering: AirStream[Any], *, heat: ArrayLike) -> Sensible[Array]: ...
def with_heat(entering: AirStream[Any], *, heat: ArrayLike) -> Sensible[Any]:
    """Heats or cools by a heat flow.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    heat : float or array_like
        Heat into the air, W.

    Returns
    -------
    Sensible

    Raises
    ------
    InfeasibleError
        Saturation or the range of states would be crossed.
    ProcessError
        Heat into no air.
    NotFiniteError, OutOfRangeError
        The heat.
    """
    expect(entering, AirStream, "entering")
    return run("sensible.with_heat", Sensible, ("entering", entering), ("heat", heat))
