"""Humidifying by steam, by evaporating spray, in washers, and by wetted media.

`saturated_steam`, `wet_steam` and `superheated_steam` give the enthalpy of what the plant delivers, `throttled_steam` what it is
in the duct; `steam_absorption` says how much of it the air takes up. Wetted media with pump, bleed and carry-over: `evaporative`
of `moistair.process`.

Water systems can grow and spread Legionella; steam burns and stands under pressure; droplets and condensate in ducts grow
mould: hygiene rules and local codes govern design and operation.
"""

from __future__ import annotations

import enum
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._rows import Array, Record, T, choice, expect, run
from ._streams import AirStream, Exchange, WetStream

__all__ = [
    "Humidified",
    "Moistening",
    "SteamAbsorption",
    "SteamCondition",
    "ThrottledSteam",
    "Washed",
    "evaporative",
    "saturated_steam",
    "saturated_steam_enthalpy",
    "spray",
    "steam",
    "steam_absorption",
    "steam_limit",
    "steam_to_humidity_ratio",
    "steam_to_relative_humidity",
    "superheated_steam",
    "throttled_steam",
    "wash",
    "wet_steam",
]


@dataclass(frozen=True, eq=False, init=False)
class Humidified(Record, Generic[T]):
    """What a humidifier did.

    Attributes
    ----------
    leaving : WetStream
        The air that leaves, with what it could not take up as liquid or ice.
    exchange : Exchange
        Water into the air and the enthalpy that came with it; heat is that of pump, make-up, spray or wall where there is one, else zero.
    evaporated : float or numpy.ndarray
        Water that became vapor, kg/s; negative where cold water condensed vapor of the air.
    carried : float or numpy.ndarray
        Water that is carried as droplets or ice, kg/s: condensed steam, or spray that did not evaporate.
    """

    leaving: WetStream[T]
    exchange: Exchange[T]
    evaporated: T
    carried: T


class SteamCondition(enum.IntEnum):
    """Whether steam carries water."""

    SUPERHEATED = 0
    """Warmer than it boils at this pressure; saturated at the least."""
    WET = 1
    """Vapor and liquid."""


class Moistening(enum.IntEnum):
    """Whether a washer gives water to the air or takes it."""

    HUMIDIFIES = 0
    """The air takes up water, or none."""
    DEHUMIDIFIES = 1
    """Vapor of the air condenses on water below its dew point."""


@dataclass(frozen=True, eq=False, init=False)
class SteamAbsorption(Record, Generic[T]):
    """How much steam air takes up. Between the two flows a part of it condenses.

    Attributes
    ----------
    up_to : float or numpy.ndarray
        Flow at which the air first saturates, kg/s: zero where it enters saturated, infinite where it never does.
    unsaturated_from : float or numpy.ndarray
        Flow from which on it is no longer saturated, kg/s; infinite where there is none.
    """

    up_to: T
    unsaturated_from: T


@dataclass(frozen=True, eq=False, init=False)
class ThrottledSteam(Record, Generic[T]):
    """Steam at a pressure.

    Attributes
    ----------
    temperature : float or numpy.ndarray
        °C.
    superheat : float or numpy.ndarray
        Above the temperature of boiling, K; zero where it is wet.
    quality : float or numpy.ndarray
        Vapor over all of it by mass; one where it is superheated.
    condition : SteamCondition or numpy.ndarray
        Superheated or wet; the code in an array, −1 without a result.
    """

    temperature: T
    superheat: T
    quality: T
    condition: Union[SteamCondition, NDArray[np.int32]]


@dataclass(frozen=True, eq=False, init=False)
class Washed(Record, Generic[T]):
    """What a washer did.

    Attributes
    ----------
    air : Humidified
        The air with its books: heat and water of the spray.
    leaving_water : float or numpy.ndarray
        Water that falls back, kg/s.
    leaving_water_temperature : float or numpy.ndarray
        Its temperature, °C.
    heat_to_water : float or numpy.ndarray
        What the water gains, its pump counted, less the enthalpy of what evaporated, W; negative where the air cools it. Not the load
        of a chiller.
    moistening : Moistening or numpy.ndarray
        Which way the water goes; the code in an array, −1 without a result.
    """

    air: Humidified[T]
    leaving_water: T
    leaving_water_temperature: T
    heat_to_water: T
    moistening: Union[Moistening, NDArray[np.int32]]


@overload
def saturated_steam_enthalpy(*, steam_temperature: float) -> float: ...
@overload
def saturated_steam_enthalpy(*, steam_temperature: ArrayLike) -> Array: ...
def saturated_steam_enthalpy(*, steam_temperature: ArrayLike) -> Any:
    """Enthalpy of saturated steam, J/kg, IAPWS-95, on the datum of liquid water at the triple point. Throttling keeps it.

    Parameters
    ----------
    steam_temperature : float or array_like
        °C, 0 to 200.

    Returns
    -------
    float or numpy.ndarray
        J/kg; NaN where a row of an array is out of range.

    Examples
    --------
    ASHRAE Fundamentals 2021 ch. 1, Example 5: 2691.07 kJ/kg at 110 °C.

    >>> from moistair.process import humidify
    >>> abs(humidify.saturated_steam_enthalpy(steam_temperature=110.0) - 2_691_070.0) < 100.0
    True
    """
    return run("humidify.saturated_steam_enthalpy", float, ("steam_temperature", steam_temperature))


@overload
def saturated_steam(*, steam_pressure: float) -> float: ...
@overload
def saturated_steam(*, steam_pressure: ArrayLike) -> Array: ...
def saturated_steam(*, steam_pressure: ArrayLike) -> Any:
    """Enthalpy of dry saturated steam of a pressure, J/kg, IAPWS-95, on the datum of liquid water at the triple point.

    Steam burns, its pipes and vessels stand under pressure: codes for pressure equipment govern.

    Parameters
    ----------
    steam_pressure : float or array_like
        Absolute, Pa, 1e3 to 1.6e6. Gauges show the excess over the atmosphere.

    Returns
    -------
    float or numpy.ndarray
        J/kg; NaN where a row of an array is out of range.

    Examples
    --------
    >>> from moistair.process import humidify
    >>> round(humidify.saturated_steam(steam_pressure=4e5), -2)
    2738100.0
    """
    return run("humidify.saturated_steam", float, ("steam_pressure", steam_pressure))


@overload
def wet_steam(*, steam_pressure: float, quality: float) -> float: ...
@overload
def wet_steam(*, steam_pressure: ArrayLike, quality: ArrayLike) -> Array: ...
def wet_steam(*, steam_pressure: ArrayLike, quality: ArrayLike) -> Any:
    """Enthalpy of wet steam, J/kg: h = h_f + x h_fg.

    Parameters
    ----------
    steam_pressure : float or array_like
        Absolute, Pa, 1e3 to 1.6e6.
    quality : float or array_like
        x, vapor over all of it by mass, 0 to 1.

    Returns
    -------
    float or numpy.ndarray
        J/kg; NaN where a row of an array has no result.

    Raises
    ------
    NotFiniteError, OutOfRangeError
        An input; so little vapor at low pressure is no steam to this library.
    """
    return run("humidify.wet_steam", float, ("steam_pressure", steam_pressure), ("quality", quality))


@overload
def superheated_steam(*, steam_temperature: float, steam_pressure: float) -> float: ...
@overload
def superheated_steam(*, steam_temperature: ArrayLike, steam_pressure: ArrayLike) -> Array: ...
def superheated_steam(*, steam_temperature: ArrayLike, steam_pressure: ArrayLike) -> Any:
    """Enthalpy of superheated steam, J/kg, IAPWS-95.

    Parameters
    ----------
    steam_temperature : float or array_like
        °C, to 400.
    steam_pressure : float or array_like
        Absolute, Pa, 1e3 to 1.6e6.

    Returns
    -------
    float or numpy.ndarray
        J/kg; NaN where a row of an array has no result.

    Raises
    ------
    InfeasibleError
        Below the temperature of boiling.
    NotFiniteError, OutOfRangeError
        An input.
    """
    arguments = ("steam_temperature", steam_temperature), ("steam_pressure", steam_pressure)
    return run("humidify.superheated_steam", float, *arguments)


@overload
def throttled_steam(*, steam_enthalpy: float, pressure: float) -> ThrottledSteam[float]: ...
@overload
def throttled_steam(*, steam_enthalpy: ArrayLike, pressure: ArrayLike) -> ThrottledSteam[Array]: ...
def throttled_steam(*, steam_enthalpy: ArrayLike, pressure: ArrayLike) -> ThrottledSteam[Any]:
    """Steam after throttling, such as to the pressure of the duct: its enthalpy is kept.

    Parameters
    ----------
    steam_enthalpy : float or array_like
        J/kg.
    pressure : float or array_like
        Absolute, after it, Pa, 1e3 to 1.6e6.

    Returns
    -------
    ThrottledSteam

    Raises
    ------
    InfeasibleError
        It would be liquid there, or hotter than 400 °C.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    Saturated steam of 4 bar comes into the duct superheated by 31 K.

    >>> from moistair.process import humidify
    >>> steam = humidify.saturated_steam(steam_pressure=4e5)
    >>> duct = humidify.throttled_steam(steam_enthalpy=steam, pressure=101_325.0)
    >>> duct.condition.name, round(duct.superheat)
    ('SUPERHEATED', 31)
    """
    return run("humidify.throttled_steam", ThrottledSteam, ("steam_enthalpy", steam_enthalpy), ("pressure", pressure))


@overload
def steam(entering: AirStream[float], *, steam_flow: float, steam_enthalpy: float) -> Humidified[float]: ...
@overload
def steam(entering: AirStream[Any], *, steam_flow: ArrayLike, steam_enthalpy: ArrayLike) -> Humidified[Array]: ...
def steam(entering: AirStream[Any], *, steam_flow: ArrayLike, steam_enthalpy: ArrayLike) -> Humidified[Any]:
    """Adds steam: W₂ = W₁ + s, h₂ = h₁ + s h_st.

    Steam beyond saturation condenses and is carried. Humidifying to at most 80 to 90 % relative humidity behind the
    humidifier is common practice (no source).

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    steam_flow : float or array_like
        kg/s.
    steam_enthalpy : float or array_like
        J/kg, see `saturated_steam_enthalpy`.

    Returns
    -------
    Humidified

    Raises
    ------
    ProcessError
        Steam into no air.
    InfeasibleError
        Outside the range of states.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    arguments = ("entering", entering), ("steam_flow", steam_flow), ("steam_enthalpy", steam_enthalpy)
    return run("humidify.steam", Humidified, *arguments)


@overload
def steam_to_humidity_ratio(
    entering: AirStream[float], *, humidity_ratio: float, steam_enthalpy: float
) -> Humidified[float]: ...
@overload
def steam_to_humidity_ratio(
    entering: AirStream[Any], *, humidity_ratio: ArrayLike, steam_enthalpy: ArrayLike
) -> Humidified[Array]: ...
def steam_to_humidity_ratio(
    entering: AirStream[Any], *, humidity_ratio: ArrayLike, steam_enthalpy: ArrayLike
) -> Humidified[Any]:
    """Adds steam up to a humidity ratio.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    humidity_ratio : float or array_like
        Target, kg/kg.
    steam_enthalpy : float or array_like
        J/kg.

    Returns
    -------
    Humidified

    Raises
    ------
    InfeasibleError
        A target below what enters.
    ProcessError, NotFiniteError, OutOfRangeError
        As `steam`.
    """
    expect(entering, AirStream, "entering")
    arguments = ("entering", entering), ("humidity_ratio", humidity_ratio), ("steam_enthalpy", steam_enthalpy)
    return run("humidify.steam_to_humidity_ratio", Humidified, *arguments)


@overload
def steam_to_relative_humidity(
    entering: AirStream[float], *, relative_humidity: float, steam_enthalpy: float
) -> Humidified[float]: ...
@overload
def steam_to_relative_humidity(
    entering: AirStream[Any], *, relative_humidity: ArrayLike, steam_enthalpy: ArrayLike
) -> Humidified[Array]: ...
def steam_to_relative_humidity(
    entering: AirStream[Any], *, relative_humidity: ArrayLike, steam_enthalpy: ArrayLike
) -> Humidified[Any]:
    """Adds steam up to a relative humidity.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    relative_humidity : float or array_like
        Target, fraction, over the stable surface.
    steam_enthalpy : float or array_like
        J/kg.

    Returns
    -------
    Humidified

    Raises
    ------
    InfeasibleError
        The air enters moister, or never gets there.
    ProcessError, NotFiniteError, OutOfRangeError
        As `steam`.
    """
    expect(entering, AirStream, "entering")
    arguments = ("entering", entering), ("relative_humidity", relative_humidity), ("steam_enthalpy", steam_enthalpy)
    return run("humidify.steam_to_relative_humidity", Humidified, *arguments)


@overload
def steam_limit(entering: AirStream[float], *, steam_enthalpy: float) -> float: ...
@overload
def steam_limit(entering: AirStream[Any], *, steam_enthalpy: ArrayLike) -> Array: ...
def steam_limit(entering: AirStream[Any], *, steam_enthalpy: ArrayLike) -> Any:
    """The steam flow at which the air first saturates, kg/s.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    steam_enthalpy : float or array_like
        J/kg.

    Returns
    -------
    float or numpy.ndarray
        kg/s; infinite where hot steam warms the air faster than it moistens it, NaN where a row of an array has no result.

    Raises
    ------
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        The enthalpy.
    """
    expect(entering, AirStream, "entering")
    return run("humidify.steam_limit", float, ("entering", entering), ("steam_enthalpy", steam_enthalpy))


@overload
def steam_absorption(entering: AirStream[float], *, steam_enthalpy: float) -> SteamAbsorption[float]: ...
@overload
def steam_absorption(entering: AirStream[Any], *, steam_enthalpy: ArrayLike) -> SteamAbsorption[Array]: ...
def steam_absorption(entering: AirStream[Any], *, steam_enthalpy: ArrayLike) -> SteamAbsorption[Any]:
    """The steam flow at which the air first saturates, and that from which on it no longer is.

    Not monotone: superheated steam may lead into saturation and out of it again, or miss it.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    steam_enthalpy : float or array_like
        J/kg.

    Returns
    -------
    SteamAbsorption

    Raises
    ------
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        The enthalpy.
    """
    expect(entering, AirStream, "entering")
    return run("humidify.steam_absorption", SteamAbsorption, ("entering", entering), ("steam_enthalpy", steam_enthalpy))


@overload
def spray(entering: AirStream[float], *, water_flow: float, water_temperature: float) -> Humidified[float]: ...
@overload
def spray(entering: AirStream[Any], *, water_flow: ArrayLike, water_temperature: ArrayLike) -> Humidified[Array]: ...
def spray(entering: AirStream[Any], *, water_flow: ArrayLike, water_temperature: ArrayLike) -> Humidified[Any]:
    """Sprays liquid water of any temperature into the air; what equilibrium does not evaporate is carried as droplets.

    Nearly along the wet-bulb line. All of the water comes to equilibrium with all of the air; see `wash` for short contact.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        kg/s.
    water_temperature : float or array_like
        °C.

    Returns
    -------
    Humidified

    Raises
    ------
    ProcessError, InfeasibleError, NotFiniteError, OutOfRangeError
        As `steam`.
    """
    expect(entering, AirStream, "entering")
    arguments = ("entering", entering), ("water_flow", water_flow), ("water_temperature", water_temperature)
    return run("humidify.spray", Humidified, *arguments)


@overload
def evaporative(
    entering: AirStream[float],
    *,
    saturation_effectiveness: float,
    water_temperature: Union[Literal["wet_bulb"], float] = ...,
) -> Humidified[float]: ...
@overload
def evaporative(
    entering: AirStream[Any],
    *,
    saturation_effectiveness: ArrayLike,
    water_temperature: Union[Literal["wet_bulb"], ArrayLike] = ...,
) -> Humidified[Array]: ...
def evaporative(
    entering: AirStream[Any],
    *,
    saturation_effectiveness: ArrayLike,
    water_temperature: Union[Literal["wet_bulb"], ArrayLike] = "wet_bulb",
) -> Humidified[Any]:
    """Wetted media or full spray of a stated saturation effectiveness (t₁ − t₂) / (t₁ − t*).

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    saturation_effectiveness : float or array_like
        0 to 1.
    water_temperature : 'wet_bulb', float or array_like
        Of the water that evaporates: the wet bulb, where recirculated water settles (the air then moves exactly along its
        wet-bulb line), or that of once-through water, °C.

    Returns
    -------
    Humidified

    Raises
    ------
    InfeasibleError
        A wet bulb below the melting temperature (the water would freeze), or water so hot that this effectiveness would need
        more vapor than the leaving air holds.
    ProcessError, NotFiniteError, OutOfRangeError
        As `steam`.
    """
    expect(entering, AirStream, "entering")
    return run(
        "humidify.evaporative",
        Humidified,
        ("entering", entering),
        ("saturation_effectiveness", saturation_effectiveness),
        *choice(water_temperature, {"wet_bulb": 0}, "water_temperature"),
    )


@overload
def wash(
    entering: AirStream[float],
    *,
    water_flow: float,
    water_temperature: float,
    effectiveness: float,
    pump_heat: float = ...,
    carry_over_fraction: float = ...,
) -> Washed[float]: ...
@overload
def wash(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    water_temperature: ArrayLike,
    effectiveness: ArrayLike,
    pump_heat: ArrayLike = ...,
    carry_over_fraction: ArrayLike = ...,
) -> Washed[Array]: ...
def wash(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    water_temperature: ArrayLike,
    effectiveness: ArrayLike,
    pump_heat: ArrayLike = 0.0,
    carry_over_fraction: ArrayLike = 0.0,
) -> Washed[Any]:
    """Washes air: heats or cools, humidifies or dehumidifies, by the temperature of the water.

    The water is well mixed, of the temperature at which it leaves; full effectiveness is equilibrium. Washers spread Legionella
    where their water is not kept clean; droplets behind eliminators grow mould.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        Water sprayed, kg/s.
    water_temperature : float or array_like
        °C; below the dew point it takes water out of the air.
    effectiveness : float or array_like
        How far the air comes toward the temperature of the water that leaves, 0 to 1.
    pump_heat : float or array_like, default 0
        Power of the pump, W.
    carry_over_fraction : float or array_like, default 0
        Droplets that pass the eliminators over the water sprayed.

    Returns
    -------
    Washed

    Raises
    ------
    InfeasibleError
        The water would freeze, is hotter than the air takes, or would all evaporate.
    ProcessError, NotFiniteError, OutOfRangeError
        As `steam`.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, humidify
    >>> entering = AirStream(MoistAir(dry_bulb=30.0, relative_humidity=0.5, pressure=101_325.0), dry_air_flow=2.0)
    >>> washer = {"water_flow": 3.0, "effectiveness": 0.9}
    >>> [humidify.wash(entering, water_temperature=t, **washer).moistening.name for t in (25.0, 7.0)]
    ['HUMIDIFIES', 'DEHUMIDIFIES']
    """
    expect(entering, AirStream, "entering")
    return run(
        "humidify.wash",
        Washed,
        ("entering", entering),
        ("water_flow", water_flow),
        ("water_temperature", water_temperature),
        ("effectiveness", effectiveness),
        ("pump_heat", pump_heat),
        ("carry_over_fraction", carry_over_fraction),
    )
