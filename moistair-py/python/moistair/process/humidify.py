"""Humidifying by steam, by evaporating spray, and by wetted media.

Water systems can grow and spread Legionella; steam burns and stands under pressure; droplets and condensate in ducts grow
mould: hygiene rules and local codes govern design and operation.
"""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

from numpy.typing import ArrayLike

from .._rows import Array, Record, T, choice, expect, run
from ._streams import AirStream, Exchange, WetStream

__all__ = [
    "Humidified",
    "evaporative",
    "saturated_steam_enthalpy",
    "spray",
    "steam",
    "steam_limit",
    "steam_to_humidity_ratio",
    "steam_to_relative_humidity",
]


@dataclass(frozen=True, eq=False, init=False)
class Humidified(Record, Generic[T]):
    """What a humidifier did.

    Attributes
    ----------
    leaving : WetStream
        The air that leaves, with what it could not take up as liquid or ice.
    exchange : Exchange
        Water into the air and the enthalpy that came with it; no heat.
    evaporated : float or numpy.ndarray
        Water that became vapor, kg/s; negative where cold water condensed vapor of the air.
    carried : float or numpy.ndarray
        Water that is carried as droplets or ice, kg/s: condensed steam, or spray that did not evaporate.
    """

    leaving: WetStream[T]
    exchange: Exchange[T]
    evaporated: T
    carried: T


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
def spray(entering: AirStream[float], *, water_flow: float, water_temperature: float) -> Humidified[float]: ...
@overload
def spray(entering: AirStream[Any], *, water_flow: ArrayLike, water_temperature: ArrayLike) -> Humidified[Array]: ...
def spray(entering: AirStream[Any], *, water_flow: ArrayLike, water_temperature: ArrayLike) -> Humidified[Any]:
    """Sprays liquid water of any temperature into the air; what equilibrium does not evaporate is carried as droplets.

    Nearly along the wet-bulb line. All of the water comes to equilibrium with all of the air; a washer, which circulates
    many times more, is not modeled here.

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
