"""Evaporative cooling: direct, indirect, and one behind the other.

Effectiveness models: what leaves is as good as the test that gave the effectiveness (ASHRAE 133 for direct, ASHRAE 143 for
indirect coolers) and holds near its flows. Heat and water close on both streams whatever it is. Not modeled: drying out of the
medium, heat through the casing, fouling, fans, how the effectiveness changes with the flows, a pinch inside the wall.

Wet media, sumps and droplets can grow and spread Legionella, moist ducts grow mould: hygiene rules and local codes govern; water
freezes in winter. Humidity behind a direct stage of 80 to 90 % at most is common practice (no source).
"""

from __future__ import annotations

import enum
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._rows import Array, Record, T, choice, expect, run
from ._streams import AirStream, Exchange, code
from .humidify import Humidified
from .tower import WaterUse

__all__ = [
    "DirectCondition",
    "DirectCooled",
    "IndirectCondition",
    "IndirectCooled",
    "TwoStageCooled",
    "direct",
    "indirect",
    "two_stage",
]

#: Toward which temperature of the secondary air the effectiveness of an indirect cooler counts.
EffectivenessOf = Union[Literal["wet_bulb"], Literal["dew_point"]]

_EFFECTIVENESS_OF = {"wet_bulb": 0, "dew_point": 1}


class DirectCondition(enum.IntEnum):
    """Whether a direct cooler has anything to do."""

    EVAPORATING = 0
    """Water evaporates."""
    ALREADY_SATURATED = 1
    """The air enters saturated: nothing evaporates but by the heat of pump and make-up."""


class IndirectCondition(enum.IntEnum):
    """What an indirect cooler came to."""

    COOLING = 0
    """The primary air is cooled and stays dry."""
    NO_DRIVE = 1
    """The secondary air is no colder than the primary where it is wet: nothing is exchanged, no water used."""
    CONDENSING = 2
    """The primary air is cooled below its dew point, and water condenses out of it."""
    FROSTING = 3
    """The same below the melting temperature: frost, which no steady state describes."""


@dataclass(frozen=True, eq=False, init=False)
class DirectCooled(Record, Generic[T]):
    """What a direct evaporative cooler did.

    Attributes
    ----------
    air : Humidified
        The air with its books: the water taken up and carried over counts with the temperature of the circulating water; heat is
        that of the pump, and of make-up and bleed where their temperatures differ.
    water_temperature : float or numpy.ndarray
        Of the circulating water, °C.
    water : WaterUse
        Evaporation, carry-over (drift), bleed (blowdown) and make-up.
    condition : DirectCondition or numpy.ndarray
        Whether there was anything to do; the code in an array, −1 without a result.
    """

    air: Humidified[T]
    water_temperature: T
    water: WaterUse[T]
    condition: Union[DirectCondition, NDArray[np.int32]]


@dataclass(frozen=True, eq=False, init=False)
class IndirectCooled(Record, Generic[T]):
    """What an indirect evaporative cooler did.

    Attributes
    ----------
    primary : AirStream
        The primary air that leaves, without its condensate.
    primary_exchange : Exchange
        Heat and water into the primary air, none of them above zero.
    secondary : Humidified
        The secondary air with its books: the heat of the wall and of the pump, and the water that evaporated.
    heat : float or numpy.ndarray
        Heat through the wall, W, positive.
    condensate : float or numpy.ndarray
        Water that drains from the primary side, kg/s, positive.
    condition : IndirectCondition or numpy.ndarray
        What it came to; the code in an array, −1 without a result.
    """

    primary: AirStream[T]
    primary_exchange: Exchange[T]
    secondary: Humidified[T]
    heat: T
    condensate: T
    condition: Union[IndirectCondition, NDArray[np.int32]]


@dataclass(frozen=True, eq=False, init=False)
class TwoStageCooled(Record, Generic[T]):
    """What a two-stage evaporative cooler did.

    Attributes
    ----------
    indirect : IndirectCooled
        The first stage, with the books of both streams.
    direct : DirectCooled
        The second stage, on the primary air that the first leaves.
    evaporated : float or numpy.ndarray
        Water that evaporates in both, kg/s.
    """

    indirect: IndirectCooled[T]
    direct: DirectCooled[T]
    evaporated: T


@overload
def direct(
    entering: AirStream[float],
    *,
    saturation_effectiveness: float,
    circulating_flow: float,
    drift_fraction: float,
    cycles_of_concentration: float,
    pump_heat: float = ...,
    make_up_temperature: Union[Literal["circulating"], float] = ...,
) -> DirectCooled[float]: ...
@overload
def direct(
    entering: AirStream[Any],
    *,
    saturation_effectiveness: ArrayLike,
    circulating_flow: ArrayLike,
    drift_fraction: ArrayLike,
    cycles_of_concentration: ArrayLike,
    pump_heat: ArrayLike = ...,
    make_up_temperature: Union[Literal["circulating"], ArrayLike] = ...,
) -> DirectCooled[Array]: ...
def direct(
    entering: AirStream[Any],
    *,
    saturation_effectiveness: ArrayLike,
    circulating_flow: ArrayLike,
    drift_fraction: ArrayLike,
    cycles_of_concentration: ArrayLike,
    pump_heat: ArrayLike = 0.0,
    make_up_temperature: Union[Literal["circulating"], ArrayLike] = "circulating",
) -> DirectCooled[Any]:
    """Cools and humidifies air over a wetted medium whose water circulates, with its pump, carry-over, bleed and make-up.

    The water settles where the heat that it gives to the air is that of its pump and of its make-up; without these at the wet
    bulb, and the air is that of `humidify.evaporative`.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    saturation_effectiveness : float or array_like
        (t₁ − t₂) / (t₁ − t_w) toward the temperature of the circulating water, 0 to 1.
    circulating_flow : float or array_like
        Water over the medium, kg/s.
    drift_fraction : float or array_like
        Carry-over of droplets over the circulating water.
    cycles_of_concentration : float or array_like
        Concentration of the circulating water over that of the make-up, above one; the bleed keeps it.
    pump_heat : float or array_like, default 0
        Power of the pump, which ends as heat in the water, W.
    make_up_temperature : 'circulating', float or array_like
        Of the make-up: that of the circulating water, or °C.

    Returns
    -------
    DirectCooled

    Raises
    ------
    InfeasibleError
        The water would freeze, more pump heat than the air takes, one cycle of concentration.
    ProcessError, NotFiniteError, OutOfRangeError
        No air flows, or an input.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, evaporative
    >>> dry = AirStream(MoistAir(dry_bulb=38.0, relative_humidity=0.15, pressure=101_325.0), dry_air_flow=2.0)
    >>> done = evaporative.direct(
    ...     dry,
    ...     saturation_effectiveness=0.85,
    ...     circulating_flow=1.0,
    ...     drift_fraction=1e-4,
    ...     cycles_of_concentration=3.0,
    ...     pump_heat=200.0,
    ...     make_up_temperature=15.0,
    ... )
    >>> done.water.make_up > done.water.evaporation
    True
    """
    expect(entering, AirStream, "entering")
    return run(
        "evaporative.direct",
        DirectCooled,
        ("entering", entering),
        ("saturation_effectiveness", saturation_effectiveness),
        ("circulating_flow", circulating_flow),
        ("pump_heat", pump_heat),
        *choice(make_up_temperature, {"circulating": 0}, "make_up_temperature"),
        ("drift_fraction", drift_fraction),
        ("cycles_of_concentration", cycles_of_concentration),
    )


@overload
def indirect(
    primary: AirStream[float],
    secondary: AirStream[float],
    *,
    effectiveness: float,
    exhaust_humidity: float,
    effectiveness_of: EffectivenessOf = ...,
    pump_heat: float = ...,
    water_temperature: Union[Literal["wet_bulb"], float] = ...,
) -> IndirectCooled[float]: ...
@overload
def indirect(
    primary: AirStream[Any],
    secondary: AirStream[Any],
    *,
    effectiveness: ArrayLike,
    exhaust_humidity: ArrayLike,
    effectiveness_of: EffectivenessOf = ...,
    pump_heat: ArrayLike = ...,
    water_temperature: Union[Literal["wet_bulb"], ArrayLike] = ...,
) -> IndirectCooled[Array]: ...
def indirect(
    primary: AirStream[Any],
    secondary: AirStream[Any],
    *,
    effectiveness: ArrayLike,
    exhaust_humidity: ArrayLike,
    effectiveness_of: EffectivenessOf = "wet_bulb",
    pump_heat: ArrayLike = 0.0,
    water_temperature: Union[Literal["wet_bulb"], ArrayLike] = "wet_bulb",
) -> IndirectCooled[Any]:
    """Cools the primary air by a wetted secondary stream behind a wall, without moistening it.

    Where the primary air would be cooled below its dew point, the heat of that cooling is kept and equilibrium decides how much
    condenses. The secondary air leaves with that heat and that of the pump at the stated humidity. The second law is not looked at,
    and freezing only at the wet bulb of the secondary air: beyond it (dew-point cycles) use effectivenesses and flows of a test.

    Parameters
    ----------
    primary : AirStream
        The air that is to be cooled.
    secondary : AirStream
        The air that is wetted; the same formulation.
    effectiveness : float or array_like
        How far the primary air is cooled, if it stays dry: 0 to 2 toward the wet bulb of the *secondary* air, where above one needs
        working air that is cooled before it is wetted; 0 to 1 toward its dew point.
    exhaust_humidity : float or array_like
        Relative humidity over liquid at which the secondary air leaves, a fraction near one (common practice, no source).
    effectiveness_of : {'wet_bulb', 'dew_point'}
        Toward which temperature of the secondary air the effectiveness counts.
    pump_heat : float or array_like, default 0
        Power of the pump, which ends as heat in the water, W.
    water_temperature : 'wet_bulb', float or array_like
        Of the water that evaporates into the secondary air: its wet bulb, or °C.

    Returns
    -------
    IndirectCooled

    Raises
    ------
    InfeasibleError
        The water would freeze, an effectiveness beyond the dew point of the secondary air, a secondary air that cannot take the heat
        or leaves drier than it can.
    ProcessError, NotFiniteError, OutOfRangeError
        No air flows, states of different formulations, or an input.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, evaporative
    >>> outdoor = AirStream(MoistAir(dry_bulb=35.0, relative_humidity=0.3, pressure=101_325.0), dry_air_flow=2.0)
    >>> room = AirStream(MoistAir(dry_bulb=25.0, relative_humidity=0.5, pressure=101_325.0), dry_air_flow=1.8)
    >>> done = evaporative.indirect(outdoor, room, effectiveness=0.65, exhaust_humidity=0.95)
    >>> round(done.primary.air.dry_bulb, 1), done.condition.name
    (23.9, 'COOLING')
    """
    expect(primary, AirStream, "primary")
    expect(secondary, AirStream, "secondary")
    return run(
        "evaporative.indirect",
        IndirectCooled,
        ("primary", primary),
        ("secondary", secondary),
        code(_EFFECTIVENESS_OF, effectiveness_of, "effectiveness_of"),
        ("effectiveness", effectiveness),
        ("exhaust_humidity", exhaust_humidity),
        ("pump_heat", pump_heat),
        *choice(water_temperature, {"wet_bulb": 0}, "water_temperature"),
    )


@overload
def two_stage(
    primary: AirStream[float],
    secondary: AirStream[float],
    *,
    effectiveness: float,
    exhaust_humidity: float,
    saturation_effectiveness: float,
    circulating_flow: float,
    drift_fraction: float,
    cycles_of_concentration: float,
    effectiveness_of: EffectivenessOf = ...,
    indirect_pump_heat: float = ...,
    water_temperature: Union[Literal["wet_bulb"], float] = ...,
    pump_heat: float = ...,
    make_up_temperature: Union[Literal["circulating"], float] = ...,
) -> TwoStageCooled[float]: ...
@overload
def two_stage(
    primary: AirStream[Any],
    secondary: AirStream[Any],
    *,
    effectiveness: ArrayLike,
    exhaust_humidity: ArrayLike,
    saturation_effectiveness: ArrayLike,
    circulating_flow: ArrayLike,
    drift_fraction: ArrayLike,
    cycles_of_concentration: ArrayLike,
    effectiveness_of: EffectivenessOf = ...,
    indirect_pump_heat: ArrayLike = ...,
    water_temperature: Union[Literal["wet_bulb"], ArrayLike] = ...,
    pump_heat: ArrayLike = ...,
    make_up_temperature: Union[Literal["circulating"], ArrayLike] = ...,
) -> TwoStageCooled[Array]: ...
def two_stage(
    primary: AirStream[Any],
    secondary: AirStream[Any],
    *,
    effectiveness: ArrayLike,
    exhaust_humidity: ArrayLike,
    saturation_effectiveness: ArrayLike,
    circulating_flow: ArrayLike,
    drift_fraction: ArrayLike,
    cycles_of_concentration: ArrayLike,
    effectiveness_of: EffectivenessOf = "wet_bulb",
    indirect_pump_heat: ArrayLike = 0.0,
    water_temperature: Union[Literal["wet_bulb"], ArrayLike] = "wet_bulb",
    pump_heat: ArrayLike = 0.0,
    make_up_temperature: Union[Literal["circulating"], ArrayLike] = "circulating",
) -> TwoStageCooled[Any]:
    """Cools the primary air by `indirect`, then by `direct`: colder than the wet bulb that entered.

    Parameters
    ----------
    primary : AirStream
        The air that is to be cooled.
    secondary : AirStream
        The air that is wetted; the same formulation.
    effectiveness : float or array_like
        How far the primary air is cooled, if it stays dry: 0 to 2 toward the wet bulb of the *secondary* air, where above one needs
        working air that is cooled before it is wetted; 0 to 1 toward its dew point.
    exhaust_humidity : float or array_like
        Relative humidity over liquid at which the secondary air leaves, a fraction near one (common practice, no source).
    saturation_effectiveness : float or array_like
        (t₁ − t₂) / (t₁ − t_w) toward the temperature of the circulating water, 0 to 1.
    circulating_flow : float or array_like
        Water over the medium, kg/s.
    drift_fraction : float or array_like
        Carry-over of droplets over the circulating water.
    cycles_of_concentration : float or array_like
        Concentration of the circulating water over that of the make-up, above one; the bleed keeps it.
    effectiveness_of : {'wet_bulb', 'dew_point'}
        Toward which temperature of the secondary air the effectiveness counts.
    indirect_pump_heat : float or array_like, default 0
        Power of the pump of the first stage, W.
    water_temperature : 'wet_bulb', float or array_like
        Of the water that evaporates into the secondary air: its wet bulb, or °C.
    pump_heat : float or array_like, default 0
        Power of the pump, which ends as heat in the water, W.
    make_up_temperature : 'circulating', float or array_like
        Of the make-up: that of the circulating water, or °C.

    Returns
    -------
    TwoStageCooled

    Raises
    ------
    InfeasibleError, ProcessError, NotFiniteError, OutOfRangeError
        Those of either stage.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, evaporative
    >>> desert = AirStream(MoistAir(dry_bulb=40.0, relative_humidity=0.12, pressure=101_325.0), dry_air_flow=1.0)
    >>> done = evaporative.two_stage(
    ...     desert,
    ...     desert,
    ...     effectiveness=0.6,
    ...     exhaust_humidity=0.95,
    ...     saturation_effectiveness=0.9,
    ...     circulating_flow=0.4,
    ...     drift_fraction=0.0,
    ...     cycles_of_concentration=3.0,
    ... )
    >>> done.direct.air.leaving.air.air.dry_bulb < desert.air.wet_bulb
    True
    """
    expect(primary, AirStream, "primary")
    expect(secondary, AirStream, "secondary")
    return run(
        "evaporative.two_stage",
        TwoStageCooled,
        ("primary", primary),
        ("secondary", secondary),
        code(_EFFECTIVENESS_OF, effectiveness_of, "effectiveness_of"),
        ("effectiveness", effectiveness),
        ("exhaust_humidity", exhaust_humidity),
        ("indirect_pump_heat", indirect_pump_heat),
        *choice(water_temperature, {"wet_bulb": 0}, "water_temperature"),
        ("saturation_effectiveness", saturation_effectiveness),
        ("circulating_flow", circulating_flow),
        ("pump_heat", pump_heat),
        *choice(make_up_temperature, {"circulating": 0}, "make_up_temperature"),
        ("drift_fraction", drift_fraction),
        ("cycles_of_concentration", cycles_of_concentration),
    )
