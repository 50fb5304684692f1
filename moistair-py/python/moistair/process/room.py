"""Rooms: gains of heat and moisture, the air that carries them away, and when reheat is unavoidable.

A room gains sensible heat Q and moisture ṁ_w, which comes with the enthalpy h_w of its source. Supply air takes both up:
all supply states that serve lie on one line of slope Δh/ΔW = (Q + ṁ_w h_w) / ṁ_w.

Two balances, exact in steady state for a room of one mixed state. Left out: storage of heat and moisture in walls and
furniture, stratification and short-circuit of the supply, infiltration other than as a gain, the heat of fan and ducts.

Supply air colder than the dew point of a space wets its outlets and the surfaces near them, and duct linings kept above
about 80 to 90 % relative humidity grow mould (common practice, no source): hygiene rules and local codes govern. Nothing
here is a safety function.
"""

from __future__ import annotations

import enum
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._core import MoistAir
from .._formulation import Formulation, formulation_code
from .._rows import Array, Record, T, expect, run
from ._streams import AirStream, Exchange, WetStream, code
from .coil import CondensateTemperature, condensate_choice
from .reheat import CoilLeaving, Reheat, leaving_choice

__all__ = [
    "Conditioned",
    "Gains",
    "LeastReheat",
    "LimitingLine",
    "ReheatCause",
    "RoomAir",
    "RoomDewPoints",
    "apparatus_dew_points",
    "conditioned",
    "gains_between",
    "latent_heat",
    "least_reheat",
    "limiting_line",
    "process_slope",
    "ratio_of_slope",
    "room_of_supply",
    "sensible_heat_ratio",
    "slope_of_ratio",
    "supply_at_flow",
    "supply_at_temperature",
]

#: How the moisture of a room comes: as saturated vapor of a temperature (people, open vessels, steam), as liquid water of a
#: temperature, which the heat of the room evaporates, or with a stated enthalpy.
Source = Union[Literal["saturated_vapor"], Literal["liquid"], Literal["enthalpy"]]

_SOURCES = {"saturated_vapor": 0, "liquid": 1, "enthalpy": 2}


class ReheatCause(enum.IntEnum):
    """Why a room needs reheat, or that it does not."""

    NOT_NEEDED = 0
    """It needs none."""
    LINE_MISSES_COIL = 1
    """Its line misses what any setting of the coil leaves."""
    COLDEST_COIL = 2
    """Its line would meet the coil, or come nearer to it, below the coldest that the coil can hold."""


@dataclass(frozen=True, eq=False, init=False)
class RoomAir(Record, Generic[T]):
    """A room and the air that is supplied to it.

    Attributes
    ----------
    supply : AirStream
        The air that is supplied.
    room : WetStream
        The air of the room, which leaves it; with fog, if the gains are more than the air holds.
    exchange : Exchange
        The gains.
    """

    supply: AirStream[T]
    room: WetStream[T]
    exchange: Exchange[T]


@dataclass(frozen=True, eq=False, init=False)
class Gains(Record, Generic[T]):
    """What a room gives to its air.

    Attributes
    ----------
    sensible : float or numpy.ndarray
        Heat that comes without water, W; negative in a room that loses heat.
    moisture : float or numpy.ndarray
        Water, kg/s; negative where it is taken out.
    """

    sensible: T
    moisture: T


@dataclass(frozen=True, eq=False, init=False)
class RoomDewPoints(Record, Generic[T]):
    """Where the line of a room meets saturation: nowhere, once, or twice.

    Attributes
    ----------
    warmer : float or numpy.ndarray
        The warmer meeting, °C, which is the coil's; NaN for a line that misses saturation: such a room needs reheat.
    colder : float or numpy.ndarray
        The colder, °C, where the line comes out of saturation again; NaN where it does not down to −40 °C.
    """

    warmer: T
    colder: T


@dataclass(frozen=True, eq=False, init=False)
class LimitingLine(Record, Generic[T]):
    """The steepest line through a room that a coil still serves without reheat.

    Attributes
    ----------
    sensible_heat_ratio : float or numpy.ndarray
        Below it reheat is unavoidable.
    slope : float or numpy.ndarray
        Δh/ΔW, J/kg.
    touches : float or numpy.ndarray
        Where it touches the curve of the coil, °C: temperature of the leaving air, or the apparatus dew point of a coil
        with bypass.
    at_coldest : bool or numpy.ndarray
        Whether the coldest that the coil can hold binds, not the curvature of saturation.
    """

    sensible_heat_ratio: T
    slope: T
    touches: T
    at_coldest: Union[bool, NDArray[np.bool_]]


@dataclass(frozen=True, eq=False, init=False)
class LeastReheat(Record, Generic[T]):
    """The least reheat of a room, over all flows of supply air.

    Attributes
    ----------
    reheat : float or numpy.ndarray
        Heat of the heater, W; 0 where none is needed.
    cause : ReheatCause or numpy.ndarray
        Whether reheat is needed, and why; an int32 array of the codes for many rows, −1 where a row has no result.
    supply : AirStream
        The supply behind the heater, at the flow with the least reheat.
    coil_leaving : MoistAir
        The air that leaves the coil.
    limit : LimitingLine
        The limit of the room.
    """

    reheat: T
    cause: Union[ReheatCause, NDArray[np.int32]]
    supply: AirStream[T]
    coil_leaving: MoistAir[T]
    limit: LimitingLine[T]


@dataclass(frozen=True, eq=False, init=False)
class Conditioned(Record, Generic[T]):
    """A room and the coil and heater that keep it.

    Attributes
    ----------
    room : RoomAir
        The room and its supply.
    reheat : Reheat
        Coil and heater, whose leaving air is the supply.
    """

    room: RoomAir[T]
    reheat: Reheat[T]


def _gains(sensible: Any, moisture: Any, source: Any, source_value: Any) -> tuple[tuple[str, Any], ...]:
    return (
        ("gains.sensible", sensible),
        ("gains.moisture", moisture),
        ("gains.moisture_source", code(_SOURCES, source, "source")[1]),
        ("gains.moisture_source.value", source_value),
    )


@overload
def supply_at_temperature(
    room: MoistAir[float],
    *,
    sensible: float,
    moisture: float,
    source_value: float,
    source: Source = ...,
    supply_temperature: float,
) -> RoomAir[float]: ...
@overload
def supply_at_temperature(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = ...,
    supply_temperature: ArrayLike,
) -> RoomAir[Array]: ...
def supply_at_temperature(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = "saturated_vapor",
    supply_temperature: ArrayLike,
) -> RoomAir[Any]:
    """The flow and the humidity ratio of supply air of a given temperature.

    Parameters
    ----------
    room : MoistAir
        State of the room.
    sensible : float or array_like
        Heat that the room gives to the air without water, W.
    moisture : float or array_like
        Water that it gives to the air, kg/s.
    source_value : float or array_like
        Temperature of that water, °C, 0 to 200; for `enthalpy` its enthalpy, J/kg.
    source : {'saturated_vapor', 'liquid', 'enthalpy'}
        How the water comes; people give off vapor of about 30 to 34 °C (common practice, no source).
    supply_temperature : float or array_like
        Temperature of the supply, °C.

    Returns
    -------
    RoomAir

    Raises
    ------
    InfeasibleError
        Such air would have to flow backwards or without end, be drier than dry or more than saturated.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    ASHRAE Fundamentals 2021 ch. 1, Example 6.

    >>> from moistair import MoistAir
    >>> from moistair.process import room
    >>> space = MoistAir(dry_bulb=25.0, wet_bulb=19.0, pressure=101_325.0)
    >>> done = room.supply_at_temperature(
    ...     space, sensible=9e3, moisture=0.0015, source_value=30.0, supply_temperature=15.0
    ... )
    >>> round(done.supply.volume_flow, 2)
    0.73
    """
    expect(room, MoistAir, "room")
    return run(
        "room.supply_at_temperature",
        RoomAir,
        ("room", room),
        *_gains(sensible, moisture, source, source_value),
        ("supply_temperature", supply_temperature),
    )


@overload
def supply_at_flow(
    room: MoistAir[float],
    *,
    sensible: float,
    moisture: float,
    source_value: float,
    source: Source = ...,
    dry_air_flow: float,
) -> RoomAir[float]: ...
@overload
def supply_at_flow(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = ...,
    dry_air_flow: ArrayLike,
) -> RoomAir[Array]: ...
def supply_at_flow(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = "saturated_vapor",
    dry_air_flow: ArrayLike,
) -> RoomAir[Any]:
    """The supply air of a given dry-air flow.

    Parameters
    ----------
    room : MoistAir
        State of the room.
    sensible : float or array_like
        Heat that the room gives to the air without water, W.
    moisture : float or array_like
        Water that it gives to the air, kg/s.
    source_value : float or array_like
        Temperature of that water, °C, 0 to 200; for `enthalpy` its enthalpy, J/kg.
    source : {'saturated_vapor', 'liquid', 'enthalpy'}
        How the water comes; people give off vapor of about 30 to 34 °C (common practice, no source).
    dry_air_flow : float or array_like
        Dry-air flow of the supply, kg/s.

    Returns
    -------
    RoomAir

    Raises
    ------
    InfeasibleError
        So little air would have to be drier than dry, or the supply would be fog or outside the range of states.
    ProcessError
        No flow.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(room, MoistAir, "room")
    return run(
        "room.supply_at_flow",
        RoomAir,
        ("room", room),
        *_gains(sensible, moisture, source, source_value),
        ("dry_air_flow", dry_air_flow),
    )


@overload
def room_of_supply(
    supply: AirStream[float],
    *,
    sensible: float,
    moisture: float,
    source_value: float,
    source: Source = ...,
) -> RoomAir[float]: ...
@overload
def room_of_supply(
    supply: AirStream[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = ...,
) -> RoomAir[Array]: ...
def room_of_supply(
    supply: AirStream[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = "saturated_vapor",
) -> RoomAir[Any]:
    """The room that a supply and the gains make; one that gains more water than its air holds carries fog.

    Parameters
    ----------
    supply : AirStream
        The air that is supplied.
    sensible : float or array_like
        Heat that the room gives to the air without water, W.
    moisture : float or array_like
        Water that it gives to the air, kg/s.
    source_value : float or array_like
        Temperature of that water, °C, 0 to 200; for `enthalpy` its enthalpy, J/kg.
    source : {'saturated_vapor', 'liquid', 'enthalpy'}
        How the water comes; people give off vapor of about 30 to 34 °C (common practice, no source).

    Returns
    -------
    RoomAir

    Raises
    ------
    InfeasibleError
        More water is taken out than the supply brings, or the room lies outside the range of states.
    ProcessError
        No flow.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(supply, AirStream, "supply")
    return run(
        "room.room_of_supply",
        RoomAir,
        ("supply", supply),
        *_gains(sensible, moisture, source, source_value),
    )


@overload
def gains_between(
    supply: AirStream[float],
    *,
    room: MoistAir[float],
    source_value: float,
    source: Source = ...,
) -> Gains[float]: ...
@overload
def gains_between(
    supply: AirStream[Any],
    *,
    room: MoistAir[Any],
    source_value: ArrayLike,
    source: Source = ...,
) -> Gains[Array]: ...
def gains_between(
    supply: AirStream[Any],
    *,
    room: MoistAir[Any],
    source_value: ArrayLike,
    source: Source = "saturated_vapor",
) -> Gains[Any]:
    """The gains of a room, from supply and room air.

    Differences of measured states: at 10 K and 1 to 2 g/kg between supply and room, 0.3 K and 3 % relative humidity are worth
    some 4 % of the sensible heat and a third to two thirds of the moisture.

    Parameters
    ----------
    supply : AirStream
        The air that is supplied.
    room : MoistAir
        State of the room.
    source_value : float or array_like
        Temperature of that water, °C, 0 to 200; for `enthalpy` its enthalpy, J/kg.
    source : {'saturated_vapor', 'liquid', 'enthalpy'}
        How the water comes; people give off vapor of about 30 to 34 °C (common practice, no source).

    Returns
    -------
    Gains

    Raises
    ------
    ProcessError
        States of different formulations.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(supply, AirStream, "supply")
    expect(room, MoistAir, "room")
    return run(
        "room.gains_between",
        Gains,
        ("supply", supply),
        ("room", room),
        ("moisture_source", code(_SOURCES, source, "source")[1]),
        ("moisture_source.value", source_value),
    )


@overload
def latent_heat(
    room: MoistAir[float],
) -> float: ...
@overload
def latent_heat(
    room: MoistAir[Any],
) -> Array: ...
def latent_heat(
    room: MoistAir[Any],
) -> Any:
    """The latent heat by which a room's gains are told apart, J/kg: the enthalpy of the vapor in its own air.

    What a gain brings beyond it is sensible, wherever the water comes from. Other definitions differ in the latent part:
    2501 kJ/kg by 2 %, the heat of vaporization by 4 %.

    Parameters
    ----------
    room : MoistAir
        State of the room.

    Returns
    -------
    float or numpy.ndarray
    """
    expect(room, MoistAir, "room")
    return run("room.latent_heat", float, ("room", room))


@overload
def sensible_heat_ratio(
    room: MoistAir[float],
    *,
    sensible: float,
    moisture: float,
    source_value: float,
    source: Source = ...,
) -> float: ...
@overload
def sensible_heat_ratio(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = ...,
) -> Array: ...
def sensible_heat_ratio(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = "saturated_vapor",
) -> Any:
    """Sensible over total gain by `latent_heat`.

    Below 0 or above 1 where one gain is negative or water evaporates in the room; never clamped.

    Parameters
    ----------
    room : MoistAir
        State of the room.
    sensible : float or array_like
        Heat that the room gives to the air without water, W.
    moisture : float or array_like
        Water that it gives to the air, kg/s.
    source_value : float or array_like
        Temperature of that water, °C, 0 to 200; for `enthalpy` its enthalpy, J/kg.
    source : {'saturated_vapor', 'liquid', 'enthalpy'}
        How the water comes; people give off vapor of about 30 to 34 °C (common practice, no source).

    Returns
    -------
    float or numpy.ndarray

    Raises
    ------
    InfeasibleError
        The gains cancel, or there are none.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(room, MoistAir, "room")
    return run(
        "room.sensible_heat_ratio",
        float,
        ("room", room),
        *_gains(sensible, moisture, source, source_value),
    )


@overload
def process_slope(
    *,
    sensible: float,
    moisture: float,
    source_value: float,
    source: Source = ...,
    pressure: float,
    formulation: Formulation = ...,
) -> float: ...
@overload
def process_slope(
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = ...,
    pressure: ArrayLike,
    formulation: Formulation = ...,
) -> Array: ...
def process_slope(
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = "saturated_vapor",
    pressure: ArrayLike,
    formulation: Formulation = "real_gas",
) -> Any:
    """Slope of the line of a room, Δh/ΔW = (Q + ṁ_w h_w) / ṁ_w, J/kg.

    Parameters
    ----------
    sensible : float or array_like
        Heat that the room gives to the air without water, W.
    moisture : float or array_like
        Water that it gives to the air, kg/s.
    source_value : float or array_like
        Temperature of that water, °C, 0 to 200; for `enthalpy` its enthalpy, J/kg.
    source : {'saturated_vapor', 'liquid', 'enthalpy'}
        How the water comes; people give off vapor of about 30 to 34 °C (common practice, no source).
    pressure : float or array_like
        Pa.
    formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
        As in `MoistAir`.

    Returns
    -------
    float or numpy.ndarray

    Raises
    ------
    InfeasibleError
        No moisture: the slope has no bound.
    NotFiniteError, OutOfRangeError
        An input.
    """
    return run(
        "room.process_slope",
        float,
        *_gains(sensible, moisture, source, source_value),
        ("pressure", pressure),
        formulation_code(formulation),
    )


@overload
def slope_of_ratio(
    room: MoistAir[float],
    *,
    sensible_heat_ratio: float,
) -> float: ...
@overload
def slope_of_ratio(
    room: MoistAir[Any],
    *,
    sensible_heat_ratio: ArrayLike,
) -> Array: ...
def slope_of_ratio(
    room: MoistAir[Any],
    *,
    sensible_heat_ratio: ArrayLike,
) -> Any:
    """Slope of the line of a sensible heat ratio through a room, h_v / (1 − SHR), J/kg.

    Parameters
    ----------
    room : MoistAir
        State of the room.
    sensible_heat_ratio : float or array_like
        Sensible over total gain by `latent_heat`.

    Returns
    -------
    float or numpy.ndarray

    Raises
    ------
    InfeasibleError
        A ratio of one, whose slope has no bound.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(room, MoistAir, "room")
    return run(
        "room.slope_of_ratio",
        float,
        ("room", room),
        ("sensible_heat_ratio", sensible_heat_ratio),
    )


@overload
def ratio_of_slope(
    room: MoistAir[float],
    *,
    slope: float,
) -> float: ...
@overload
def ratio_of_slope(
    room: MoistAir[Any],
    *,
    slope: ArrayLike,
) -> Array: ...
def ratio_of_slope(
    room: MoistAir[Any],
    *,
    slope: ArrayLike,
) -> Any:
    """Sensible heat ratio of a slope through a room, 1 − h_v / slope.

    Parameters
    ----------
    room : MoistAir
        State of the room.
    slope : float or array_like
        Δh/ΔW, J/kg.

    Returns
    -------
    float or numpy.ndarray

    Raises
    ------
    InfeasibleError
        A slope of zero, that of gains which cancel.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(room, MoistAir, "room")
    return run("room.ratio_of_slope", float, ("room", room), ("slope", slope))


@overload
def apparatus_dew_points(
    room: MoistAir[float],
    *,
    sensible_heat_ratio: float,
) -> RoomDewPoints[float]: ...
@overload
def apparatus_dew_points(
    room: MoistAir[Any],
    *,
    sensible_heat_ratio: ArrayLike,
) -> RoomDewPoints[Array]: ...
def apparatus_dew_points(
    room: MoistAir[Any],
    *,
    sensible_heat_ratio: ArrayLike,
) -> RoomDewPoints[Any]:
    """Where the line of the supply states of a cooled room meets saturation.

    Not for a room that liquid water cools (a ratio below 0): its line runs the other way.

    The line is straight in enthalpy and humidity ratio.

    Parameters
    ----------
    room : MoistAir
        State of the room.
    sensible_heat_ratio : float or array_like
        Sensible over total gain by `latent_heat`.

    Returns
    -------
    RoomDewPoints

    Raises
    ------
    InfeasibleError
        The dew point of the room lies below −40 °C.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import room
    >>> space = MoistAir(dry_bulb=24.0, relative_humidity=0.5, pressure=101_325.0)
    >>> round(room.apparatus_dew_points(space, sensible_heat_ratio=0.8).warmer, 1)
    10.6
    >>> room.apparatus_dew_points(space, sensible_heat_ratio=0.6).warmer  # needs reheat
    nan
    """
    expect(room, MoistAir, "room")
    return run(
        "room.apparatus_dew_points",
        RoomDewPoints,
        ("room", room),
        ("sensible_heat_ratio", sensible_heat_ratio),
    )


@overload
def limiting_line(
    room: MoistAir[float],
    *,
    entering: MoistAir[float],
    coil_leaving: float,
    characteristic: CoilLeaving = ...,
    coldest: float = ...,
) -> LimitingLine[float]: ...
@overload
def limiting_line(
    room: MoistAir[Any],
    *,
    entering: MoistAir[Any],
    coil_leaving: ArrayLike,
    characteristic: CoilLeaving = ...,
    coldest: ArrayLike = ...,
) -> LimitingLine[Array]: ...
def limiting_line(
    room: MoistAir[Any],
    *,
    entering: MoistAir[Any],
    coil_leaving: ArrayLike,
    characteristic: CoilLeaving = "relative_humidity",
    coldest: ArrayLike = 0.0,
) -> LimitingLine[Any]:
    """The limit of a room: the tangent from its state to the curve of what the coil can leave, or the line to its coldest end.

    Parameters
    ----------
    room : MoistAir
        State of the room.
    entering : MoistAir
        State that enters the coil; of account with a bypass.
    coil_leaving : float or array_like
        Relative humidity of the air that the coil leaves, 0.2 to 1; or the bypass factor, 0 to below 1.
    characteristic : {'relative_humidity', 'bypass'}
        What the coil is known by.
    coldest : float or array_like
        The coldest apparatus dew point that the coil can hold, °C; read for `bypass` only.

    Returns
    -------
    LimitingLine

    Raises
    ------
    InfeasibleError
        The coil cannot get as dry as the room, cannot cool it, or what passes and what the surface leaves would mix to fog.
    ProcessError
        States of different formulations.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(room, MoistAir, "room")
    expect(entering, MoistAir, "entering")
    return run(
        "room.limiting_line",
        LimitingLine,
        ("room", room),
        ("entering", entering),
        *leaving_choice(coil_leaving, characteristic, coldest),
    )


@overload
def least_reheat(
    room: MoistAir[float],
    *,
    sensible: float,
    moisture: float,
    source_value: float,
    source: Source = ...,
    entering: MoistAir[float],
    coil_leaving: float,
    characteristic: CoilLeaving = ...,
    coldest: float = ...,
) -> LeastReheat[float]: ...
@overload
def least_reheat(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = ...,
    entering: MoistAir[Any],
    coil_leaving: ArrayLike,
    characteristic: CoilLeaving = ...,
    coldest: ArrayLike = ...,
) -> LeastReheat[Array]: ...
def least_reheat(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = "saturated_vapor",
    entering: MoistAir[Any],
    coil_leaving: ArrayLike,
    characteristic: CoilLeaving = "relative_humidity",
    coldest: ArrayLike = 0.0,
) -> LeastReheat[Any]:
    """The least reheat with which coil and heater keep a room of given gains, over all flows of supply air.

    Codes restrict simultaneous heating and cooling; this reports the reheat and does not judge it.

    Parameters
    ----------
    room : MoistAir
        State of the room.
    sensible : float or array_like
        Heat that the room gives to the air without water, W.
    moisture : float or array_like
        Water that it gives to the air, kg/s.
    source_value : float or array_like
        Temperature of that water, °C, 0 to 200; for `enthalpy` its enthalpy, J/kg.
    source : {'saturated_vapor', 'liquid', 'enthalpy'}
        How the water comes; people give off vapor of about 30 to 34 °C (common practice, no source).
    entering : MoistAir
        State that enters the coil; of account with a bypass.
    coil_leaving : float or array_like
        Relative humidity of the air that the coil leaves, 0.2 to 1; or the bypass factor, 0 to below 1.
    characteristic : {'relative_humidity', 'bypass'}
        What the coil is known by.
    coldest : float or array_like
        The coldest apparatus dew point that the coil can hold, °C; read for `bypass` only.

    Returns
    -------
    LeastReheat

    Raises
    ------
    InfeasibleError
        No moisture has to be taken out, or as `limiting_line`.
    ProcessError
        States of different formulations.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import room
    >>> space = MoistAir(dry_bulb=24.0, relative_humidity=0.5, pressure=101_325.0)
    >>> least = room.least_reheat(
    ...     space, sensible=4e3, moisture=5.0 / 3600.0, source_value=32.0, entering=space, coil_leaving=0.95
    ... )
    >>> least.cause.name, 1.5e3 < least.reheat < 3.5e3
    ('LINE_MISSES_COIL', True)
    """
    expect(room, MoistAir, "room")
    expect(entering, MoistAir, "entering")
    return run(
        "room.least_reheat",
        LeastReheat,
        ("room", room),
        *_gains(sensible, moisture, source, source_value),
        ("entering", entering),
        *leaving_choice(coil_leaving, characteristic, coldest),
    )


@overload
def conditioned(
    room: MoistAir[float],
    *,
    sensible: float,
    moisture: float,
    source_value: float,
    source: Source = ...,
    entering: AirStream[float],
    coil_leaving: float,
    characteristic: CoilLeaving = ...,
    coldest: float = ...,
    condensate_temperature: Union[CondensateTemperature, float] = ...,
) -> Conditioned[float]: ...
@overload
def conditioned(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = ...,
    entering: AirStream[Any],
    coil_leaving: ArrayLike,
    characteristic: CoilLeaving = ...,
    coldest: ArrayLike = ...,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = ...,
) -> Conditioned[Array]: ...
def conditioned(
    room: MoistAir[Any],
    *,
    sensible: ArrayLike,
    moisture: ArrayLike,
    source_value: ArrayLike,
    source: Source = "saturated_vapor",
    entering: AirStream[Any],
    coil_leaving: ArrayLike,
    characteristic: CoilLeaving = "relative_humidity",
    coldest: ArrayLike = 0.0,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air",
) -> Conditioned[Any]:
    """What coil and heater have to do to the air that enters them so that a room is kept at a state.

    Parameters
    ----------
    room : MoistAir
        State of the room.
    sensible : float or array_like
        Heat that the room gives to the air without water, W.
    moisture : float or array_like
        Water that it gives to the air, kg/s.
    source_value : float or array_like
        Temperature of that water, °C, 0 to 200; for `enthalpy` its enthalpy, J/kg.
    source : {'saturated_vapor', 'liquid', 'enthalpy'}
        How the water comes; people give off vapor of about 30 to 34 °C (common practice, no source).
    entering : AirStream
        The air that enters the coil, at the flow of the supply.
    coil_leaving : float or array_like
        Relative humidity of the air that the coil leaves, 0.2 to 1; or the bypass factor, 0 to below 1.
    characteristic : {'relative_humidity', 'bypass'}
        What the coil is known by.
    coldest : float or array_like
        The coldest apparatus dew point that the coil can hold, °C; read for `bypass` only.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.

    Returns
    -------
    Conditioned

    Raises
    ------
    InfeasibleError
        As `supply_at_flow` and `reheat.with_coil`.
    ProcessError
        States of different formulations, or no flow.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(room, MoistAir, "room")
    expect(entering, AirStream, "entering")
    return run(
        "room.conditioned",
        Conditioned,
        ("room", room),
        *_gains(sensible, moisture, source, source_value),
        ("entering", entering),
        *leaving_choice(coil_leaving, characteristic, coldest),
        *condensate_choice(condensate_temperature),
    )
