"""Cooling coils: to a given leaving state, by bypass factor, and between two measured states."""

from __future__ import annotations

import enum
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._core import MoistAir
from .._rows import Array, Record, T, choice, expect, run
from ._streams import AirStream, Exchange

__all__ = ["Apparatus", "CoilRegime", "Cooling", "apparatus_dew_point", "between", "by_bypass_factor", "to_state"]

#: What stands for the temperature at which condensate leaves: an assumption. In all it carries about 1 % of the load.
CondensateTemperature = Union[Literal["leaving_air"], Literal["apparatus"]]


def condensate_choice(value: Any) -> tuple[tuple[str, Any], tuple[str, Any]]:
    return choice(value, {"leaving_air": 0, "apparatus": 1}, "condensate_temperature")


class CoilRegime(enum.IntEnum):
    """Whether and how water condensed."""

    DRY = 0
    """No condensate."""
    WET = 1
    """Liquid condensate."""
    FROST = 2
    """The surface or the leaving air is below the melting temperature: frost, which no steady state describes."""


@dataclass(frozen=True, eq=False, init=False)
class Cooling(Record, Generic[T]):
    """What a cooling coil did.

    Attributes
    ----------
    entering : AirStream
        The air that enters, as the books have it.
    leaving : AirStream
        The air that leaves.
    exchange : Exchange
        Heat and water into the air, both negative here.
    cooling_load : float or numpy.ndarray
        Heat taken out by the coil, W, positive; negative only from `between`, where the leaving air reads warmer.
    sensible : float or numpy.ndarray
        ṁ (h(t₁, W₂) − h(t₂, W₂)), W.
    latent : float or numpy.ndarray
        The rest of the cooling load, W.
    condensate : float or numpy.ndarray
        Water that drains, kg/s, positive.
    regime : CoilRegime or numpy.ndarray
        Dry, wet or frosting; an int32 array of the codes for many rows, −1 where a row has no result.
    sensible_heat_ratio : float or numpy.ndarray
        Sensible over total; NaN without a load.
    """

    entering: AirStream[T]
    leaving: AirStream[T]
    exchange: Exchange[T]
    cooling_load: T
    sensible: T
    latent: T
    condensate: T
    regime: Union[CoilRegime, NDArray[np.int32]]
    sensible_heat_ratio: T


@overload
def to_state(
    entering: AirStream[float],
    *,
    leaving: MoistAir[float],
    condensate_temperature: Union[CondensateTemperature, float] = ...,
) -> Cooling[float]: ...
@overload
def to_state(
    entering: AirStream[Any],
    *,
    leaving: MoistAir[Any],
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = ...,
) -> Cooling[Array]: ...
def to_state(
    entering: AirStream[Any],
    *,
    leaving: MoistAir[Any],
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air",
) -> Cooling[Any]:
    """Cools to a given leaving state: Q = ṁ ((h₁ − h₂) − (W₁ − W₂) h_c).

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    leaving : MoistAir
        State that leaves.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C; that of the leaving air by default, as the handbook's examples
        take it. That of the apparatus is the one of `apparatus_dew_point`.

    Returns
    -------
    Cooling

    Raises
    ------
    InfeasibleError
        The leaving air is moister or warmer than the entering, or has no apparatus dew point where that is asked for.
    ProcessError
        States of different formulations.
    NotFiniteError, OutOfRangeError
        The temperature of the condensate.

    Examples
    --------
    5 m³/s from 30 °C, 50 % to saturation at 10 °C, as in ASHRAE Fundamentals 2021 ch. 1, Example 3.

    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, coil
    >>> air = MoistAir(dry_bulb=30.0, relative_humidity=0.5, pressure=101_325.0)
    >>> entering = AirStream.from_volume_flow(air, volume_flow=5.0)
    >>> leaving = MoistAir(dry_bulb=10.0, relative_humidity=1.0, pressure=101_325.0)
    >>> cooling = coil.to_state(entering, leaving=leaving)
    >>> round(cooling.cooling_load / 1000.0), cooling.regime.name
    (198, 'WET')
    """
    expect(entering, AirStream, "entering")
    expect(leaving, MoistAir, "leaving")
    condensate = condensate_choice(condensate_temperature)
    return run("coil.to_state", Cooling, ("entering", entering), ("leaving", leaving), *condensate)


@overload
def by_bypass_factor(
    entering: AirStream[float],
    *,
    apparatus_dew_point: float,
    bypass_factor: float,
    condensate_temperature: Union[CondensateTemperature, float] = ...,
) -> Cooling[float]: ...
@overload
def by_bypass_factor(
    entering: AirStream[Any],
    *,
    apparatus_dew_point: ArrayLike,
    bypass_factor: ArrayLike,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = ...,
) -> Cooling[Array]: ...
def by_bypass_factor(
    entering: AirStream[Any],
    *,
    apparatus_dew_point: ArrayLike,
    bypass_factor: ArrayLike,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air",
) -> Cooling[Any]:
    """A coil known by its apparatus dew point and bypass factor.

    Humidity ratio and enthalpy that leave lie at the bypass factor between those of the saturated surface and of the
    entering air; the temperature follows. A surface above the dew point leaves the air's water alone.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    apparatus_dew_point : float or array_like
        °C.
    bypass_factor : float or array_like
        0 to 1.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.

    Returns
    -------
    Cooling

    Raises
    ------
    InfeasibleError
        An apparatus dew point above the entering dry bulb.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    return run(
        "coil.by_bypass_factor",
        Cooling,
        ("entering", entering),
        ("apparatus_dew_point", apparatus_dew_point),
        ("bypass_factor", bypass_factor),
        *condensate_choice(condensate_temperature),
    )


@dataclass(frozen=True, eq=False, init=False)
class Apparatus(Record, Generic[T]):
    """A coil by its bypass.

    Attributes
    ----------
    dew_point : float or numpy.ndarray
        Where the line from the entering through the leaving air meets saturation, °C.
    bypass_factor : float or numpy.ndarray
        The share of the air that seems to pass untouched; 0 for air that leaves saturated.
    """

    dew_point: T
    bypass_factor: T


@overload
def apparatus_dew_point(entering: MoistAir[float], *, leaving: MoistAir[float]) -> Apparatus[float]: ...
@overload
def apparatus_dew_point(entering: MoistAir[Any], *, leaving: MoistAir[Any]) -> Apparatus[Array]: ...
def apparatus_dew_point(entering: MoistAir[Any], *, leaving: MoistAir[Any]) -> Apparatus[Any]:
    """The apparatus dew point and bypass factor that take the entering to the leaving air, the inverse of `by_bypass_factor`.

    The line is straight in enthalpy and humidity ratio. It meets the saturation curve once, twice or not at all; the warmer
    meeting is the coil's.

    Parameters
    ----------
    entering, leaving : MoistAir
        The air on both sides.

    Returns
    -------
    Apparatus

    Raises
    ------
    InfeasibleError
        Nothing condenses, the air leaves warmer, or the line misses saturation, as lines of much dehumidifying do: such a
        state takes a coil and reheat.
    ProcessError
        States of different formulations.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import coil
    >>> entering = MoistAir(dry_bulb=27.0, relative_humidity=0.5, pressure=101_325.0)
    >>> leaving = MoistAir(dry_bulb=13.0, relative_humidity=0.95, pressure=101_325.0)
    >>> round(coil.apparatus_dew_point(entering, leaving=leaving).dew_point, 1)
    11.9
    """
    expect(entering, MoistAir, "entering")
    expect(leaving, MoistAir, "leaving")
    return run("coil.apparatus_dew_point", Apparatus, ("entering", entering), ("leaving", leaving))


@overload
def between(
    entering: AirStream[float],
    *,
    leaving: MoistAir[float],
    dead_band: float,
    condensate_temperature: Union[CondensateTemperature, float] = ...,
) -> Cooling[float]: ...
@overload
def between(
    entering: AirStream[Any],
    *,
    leaving: MoistAir[Any],
    dead_band: ArrayLike,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = ...,
) -> Cooling[Array]: ...
def between(
    entering: AirStream[Any],
    *,
    leaving: MoistAir[Any],
    dead_band: ArrayLike,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air",
) -> Cooling[Any]:
    """The coil between two measured states.

    Differences of humidity ratio within the dead band are noise of the sensors: the coil then counts as dry and the air
    keeps the humidity ratio that it enters with, so that noise does not add up to condensate. Only what the leaving air
    cannot hold at its temperature still condenses. Air that leaves warmer, by noise or by a heater, makes a negative load.

    Parameters
    ----------
    entering : AirStream
        The air that enters, as measured.
    leaving : MoistAir
        The air that leaves, as measured.
    dead_band : float or array_like
        kg/kg.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.

    Returns
    -------
    Cooling

    Raises
    ------
    InfeasibleError
        The leaving air is moister by more than the dead band.
    ProcessError
        States of different formulations.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    expect(leaving, MoistAir, "leaving")
    return run(
        "coil.between",
        Cooling,
        ("entering", entering),
        ("leaving", leaving),
        *condensate_choice(condensate_temperature),
        ("dead_band", dead_band),
    )
