"""Coils: to a given leaving state, by bypass factor, between two measured states, and from their conductances and their water.

A coil with air below freezing on it, or with water that stands still in it, can freeze and burst within minutes: a
hard-wired freezestat protects it, never a computed temperature. Wet surfaces and pans that do not drain grow mould. Local
codes govern.
"""

from __future__ import annotations

import enum
import operator
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._core import MoistAir
from .._rows import Array, Record, T, choice, expect, run
from ._streams import AirStream, Exchange, code

__all__ = [
    "Apparatus",
    "ApparatusDewPoints",
    "CoilRegime",
    "CoilSurface",
    "Cooling",
    "LoadByWater",
    "WaterCoil",
    "apparatus_dew_point",
    "apparatus_dew_points",
    "between",
    "by_bypass_factor",
    "bypass_factor_of_rows",
    "load_by_water",
    "surface_at_flows",
    "surface_from_rating",
    "to_state",
    "with_water",
]

#: What stands for the temperature at which condensate leaves: an assumption. In all it carries about 1 % of the load.
CondensateTemperature = Union[Literal["leaving_air"], Literal["apparatus"]]

#: How air and water pass each other: against each other, or across, neither mixed (for coils that stay dry).
Arrangement = Union[Literal["counterflow"], Literal["cross_flow"]]

#: What was measured behind a coil.
Measured = Union[Literal["leaving_air"], Literal["leaving_water"], Literal["heat"]]

ARRANGEMENTS = {"counterflow": 0, "cross_flow": 1}
_MEASURED = {"leaving_air": 0, "leaving_water": 1, "heat": 2}


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
    PARTLY_WET = 3
    """Liquid condensate on a part of the surface; the part that the air meets first is dry."""


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
        Heat taken out by the coil, W, positive; negative from `between`, where the leaving air reads warmer, and from
        `with_water` with warm water.
    sensible : float or numpy.ndarray
        ṁ (h(t₁, W₂) − h(t₂, W₂)), W.
    latent : float or numpy.ndarray
        The rest of the cooling load, W.
    condensate : float or numpy.ndarray
        Water that drains, kg/s, positive.
    regime : CoilRegime or numpy.ndarray
        Dry, wet, frosting or partly wet; an int32 array of the codes for many rows, −1 where a row has no result.
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


@dataclass(frozen=True, eq=False, init=False)
class ApparatusDewPoints(Record, Generic[T]):
    """Where the line from the entering through the leaving air meets saturation: nowhere, once, or twice.

    Attributes
    ----------
    warmer : Apparatus
        The warmer meeting, which is the coil's; NaN for a line that misses saturation.
    colder : Apparatus
        The colder, where the line comes out of saturation again; NaN where it does not down to −40 °C.
    nearest : float or numpy.ndarray
        Where the line comes nearest to saturation, if it misses it, °C; otherwise the warmer meeting.
    """

    warmer: Apparatus[T]
    colder: Apparatus[T]
    nearest: T


@overload
def apparatus_dew_points(entering: MoistAir[float], *, leaving: MoistAir[float]) -> ApparatusDewPoints[float]: ...
@overload
def apparatus_dew_points(entering: MoistAir[Any], *, leaving: MoistAir[Any]) -> ApparatusDewPoints[Array]: ...
def apparatus_dew_points(entering: MoistAir[Any], *, leaving: MoistAir[Any]) -> ApparatusDewPoints[Any]:
    """All meetings of the line from the entering through the leaving air with saturation, below the leaving dry bulb.

    Parameters
    ----------
    entering, leaving : MoistAir
        The air on both sides.

    Returns
    -------
    ApparatusDewPoints

    Raises
    ------
    InfeasibleError
        Nothing condenses, or the air leaves warmer.
    ProcessError
        States of different formulations.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import coil
    >>> entering = MoistAir(dry_bulb=27.0, relative_humidity=0.5, pressure=101_325.0)
    >>> leaving = MoistAir(dry_bulb=13.0, relative_humidity=0.85, pressure=101_325.0)
    >>> found = coil.apparatus_dew_points(entering, leaving=leaving)
    >>> found.colder.dew_point < found.warmer.dew_point < 13.0
    True
    """
    expect(entering, MoistAir, "entering")
    expect(leaving, MoistAir, "leaving")
    return run("coil.apparatus_dew_points", ApparatusDewPoints, ("entering", entering), ("leaving", leaving))


@overload
def bypass_factor_of_rows(*, of_one_row: float, rows: int) -> float: ...
@overload
def bypass_factor_of_rows(*, of_one_row: ArrayLike, rows: int) -> Array: ...
def bypass_factor_of_rows(*, of_one_row: ArrayLike, rows: int) -> Any:
    """The bypass factor of a number of equal rows, one behind the other.

    Parameters
    ----------
    of_one_row : float or array_like
        Bypass factor of one of them, 0 to 1.
    rows : int
        How many.

    Returns
    -------
    float or numpy.ndarray

    Raises
    ------
    NotFiniteError, OutOfRangeError
        The bypass factor.

    Examples
    --------
    >>> from moistair.process import coil
    >>> coil.bypass_factor_of_rows(of_one_row=0.5, rows=4)
    0.0625
    """
    return run("coil.bypass_factor_of_rows", float, ("of_one_row", of_one_row), ("rows", operator.index(rows)))


@dataclass(frozen=True, eq=False, init=False)
class WaterCoil(Record, Generic[T]):
    """What a coil with water in it did.

    Attributes
    ----------
    air : Cooling
        The air side. A coil that heats has a negative cooling load.
    leaving_water : float or numpy.ndarray
        Temperature of the water that leaves, °C; it takes up the heat that `air.exchange` takes out.
    dry_fraction : float or numpy.ndarray
        Share of the surface on which nothing condenses.
    coldest_surface : float or numpy.ndarray
        The coldest metal, at one end of the coil, °C.
    freezing : bool or numpy.ndarray
        The coldest metal is below the melting temperature and there is water in it. No freezestat.
    """

    air: Cooling[T]
    leaving_water: T
    dry_fraction: T
    coldest_surface: T
    freezing: Union[bool, NDArray[np.bool_]]


@overload
def with_water(
    entering: AirStream[float],
    *,
    air_side: float,
    water_side: float,
    water_flow: float,
    entering_water: float,
    specific_heat: Union[Literal["water"], float] = ...,
    arrangement: Arrangement = ...,
    condensate_temperature: Union[CondensateTemperature, float] = ...,
) -> WaterCoil[float]: ...
@overload
def with_water(
    entering: AirStream[Any],
    *,
    air_side: ArrayLike,
    water_side: ArrayLike,
    water_flow: ArrayLike,
    entering_water: ArrayLike,
    specific_heat: Union[Literal["water"], ArrayLike] = ...,
    arrangement: Arrangement = ...,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = ...,
) -> WaterCoil[Array]: ...
def with_water(
    entering: AirStream[Any],
    *,
    air_side: ArrayLike,
    water_side: ArrayLike,
    water_flow: ArrayLike,
    entering_water: ArrayLike,
    specific_heat: Union[Literal["water"], ArrayLike] = "water",
    arrangement: Arrangement = "counterflow",
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air",
) -> WaterCoil[Any]:
    """A coil from its conductances and the water that enters it: dry, wet or partly wet.

    By effectiveness and number of transfer units, on temperature where the surface is dry and on enthalpy where it is wet
    (Threlkeld 1970; Braun, Klein & Mitchell 1989). It cools or heats, as the water is colder or warmer than the air;
    without water flow or without conductance it changes nothing. Left out: that conductances change with flow, that wet
    fins have a lower efficiency, evaporation of condensate at part load, growth of frost, uneven flow.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    air_side : float or array_like
        Conductance from air to metal with the fins' efficiency, for sensible heat, W/K.
    water_side : float or array_like
        Conductance from metal to water, W/K.
    water_flow : float or array_like
        kg/s.
    entering_water : float or array_like
        Temperature of the water that enters, °C.
    specific_heat : 'water', float or array_like
        Of a brine that does not freeze, J/(kg K).
    arrangement : {'counterflow', 'cross_flow'}
        Cross-flow is for coils that stay dry.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C; that of the apparatus is the mean of the surface that condenses.

    Returns
    -------
    WaterCoil

    Raises
    ------
    InfeasibleError
        Water would freeze in the coil, a coil in cross-flow would get wet, or the air would leave above its range.
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, coil
    >>> air = MoistAir(dry_bulb=27.0, relative_humidity=0.5, pressure=101_325.0)
    >>> entering = AirStream(air, dry_air_flow=1.0)
    >>> done = coil.with_water(entering, air_side=3e3, water_side=6e3, water_flow=1.6, entering_water=6.0)
    >>> round(done.air.cooling_load / 1000.0, 1), done.air.regime.name
    (24.3, 'WET')
    """
    expect(entering, AirStream, "entering")
    return run(
        "coil.with_water",
        WaterCoil,
        ("entering", entering),
        ("air_side", air_side),
        ("water_side", water_side),
        code(ARRANGEMENTS, arrangement, "arrangement"),
        ("water_flow", water_flow),
        ("entering_water", entering_water),
        *choice(specific_heat, {"water": 0}, "specific_heat"),
        *condensate_choice(condensate_temperature),
    )


@dataclass(frozen=True, eq=False, init=False)
class CoilSurface(Record, Generic[T]):
    """A coil by its conductances at the flows at hand.

    Attributes
    ----------
    air_side : float or numpy.ndarray
        From air to metal, W/K.
    water_side : float or numpy.ndarray
        From metal to water, W/K.
    """

    air_side: T
    water_side: T


@overload
def surface_from_rating(
    entering: AirStream[float],
    *,
    water_flow: float,
    entering_water: float,
    value: float,
    measured: Measured = ...,
    conductance_ratio: float,
    specific_heat: Union[Literal["water"], float] = ...,
    arrangement: Arrangement = ...,
) -> CoilSurface[float]: ...
@overload
def surface_from_rating(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    entering_water: ArrayLike,
    value: ArrayLike,
    measured: Measured = ...,
    conductance_ratio: ArrayLike,
    specific_heat: Union[Literal["water"], ArrayLike] = ...,
    arrangement: Arrangement = ...,
) -> CoilSurface[Array]: ...
def surface_from_rating(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    entering_water: ArrayLike,
    value: ArrayLike,
    measured: Measured = "leaving_air",
    conductance_ratio: ArrayLike,
    specific_heat: Union[Literal["water"], ArrayLike] = "water",
    arrangement: Arrangement = "counterflow",
) -> CoilSurface[Any]:
    """The conductances of a coil that explain one measured point; `with_water` then predicts others.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        kg/s.
    entering_water : float or array_like
        Temperature of the water that enters, °C.
    value : float or array_like
        What was measured, °C or W.
    measured : {'leaving_air', 'leaving_water', 'heat'}
        What the value is; heat is into the air, negative where the coil cools.
    conductance_ratio : float or array_like
        Of the water side over the air side; 1 to 5 is common practice, no source.
    specific_heat, arrangement
        As in `with_water`.

    Returns
    -------
    CoilSurface

    Raises
    ------
    InfeasibleError
        No conductance explains the value; the limits are what no and endless surface would give.
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, coil
    >>> air = MoistAir(dry_bulb=27.0, relative_humidity=0.5, pressure=101_325.0)
    >>> entering = AirStream(air, dry_air_flow=1.0)
    >>> surface = coil.surface_from_rating(
    ...     entering, water_flow=1.6, entering_water=6.0, value=11.0, conductance_ratio=2.0
    ... )
    >>> round(surface.air_side / 1000.0, 1)
    3.0
    """
    expect(entering, AirStream, "entering")
    return run(
        "coil.surface_from_rating",
        CoilSurface,
        ("entering", entering),
        ("water_flow", water_flow),
        ("entering_water", entering_water),
        *choice(specific_heat, {"water": 0}, "specific_heat"),
        code(_MEASURED, measured, "measured"),
        ("value", value),
        ("conductance_ratio", conductance_ratio),
        code(ARRANGEMENTS, arrangement, "arrangement"),
    )


@overload
def surface_at_flows(
    *,
    air_side: float,
    water_side: float,
    found_at_air_flow: float,
    found_at_water_flow: float,
    air_flow: float,
    water_flow: float,
    air_side_exponent: float,
    water_side_exponent: float,
) -> CoilSurface[float]: ...
@overload
def surface_at_flows(
    *,
    air_side: ArrayLike,
    water_side: ArrayLike,
    found_at_air_flow: ArrayLike,
    found_at_water_flow: ArrayLike,
    air_flow: ArrayLike,
    water_flow: ArrayLike,
    air_side_exponent: ArrayLike,
    water_side_exponent: ArrayLike,
) -> CoilSurface[Array]: ...
def surface_at_flows(
    *,
    air_side: ArrayLike,
    water_side: ArrayLike,
    found_at_air_flow: ArrayLike,
    found_at_water_flow: ArrayLike,
    air_flow: ArrayLike,
    water_flow: ArrayLike,
    air_side_exponent: ArrayLike,
    water_side_exponent: ArrayLike,
) -> CoilSurface[Any]:
    """The conductances of a coil at other flows than those that they were found at.

    Each goes with a power of its flow, which is good for a few per cent down to half of the flows (common practice, no
    source).

    Parameters
    ----------
    air_side, water_side : float or array_like
        Conductances that were found, W/K.
    found_at_air_flow, found_at_water_flow : float or array_like
        Dry air and water at which they were, kg/s.
    air_flow, water_flow : float or array_like
        Those that the conductances are wanted at, kg/s.
    air_side_exponent : float or array_like
        Power of the air's flow, 0 to 1; 0.4 to 0.7 with fins (common practice, no source).
    water_side_exponent : float or array_like
        Power of the water's flow, 0 to 1; 0.8 while the water is turbulent (Dittus and Boelter 1930; from memory).

    Returns
    -------
    CoilSurface

    Raises
    ------
    InfeasibleError
        A conductance beyond its range, as of one that was found without a flow.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair.process import coil
    >>> part_load = coil.surface_at_flows(
    ...     air_side=2e4, water_side=4e4, found_at_air_flow=6.0, found_at_water_flow=5.0, air_flow=6.0, water_flow=2.5,
    ...     air_side_exponent=0.6, water_side_exponent=0.8,
    ... )
    >>> part_load.air_side, round(part_load.water_side)
    (20000.0, 22974)
    """
    return run(
        "coil.surface_at_flows",
        CoilSurface,
        ("air_side", air_side),
        ("water_side", water_side),
        ("arrangement", 0),
        ("found_at_air_flow", found_at_air_flow),
        ("found_at_water_flow", found_at_water_flow),
        ("air_flow", air_flow),
        ("water_flow", water_flow),
        ("air_side_exponent", air_side_exponent),
        ("water_side_exponent", water_side_exponent),
    )


@dataclass(frozen=True, eq=False, init=False)
class LoadByWater(Record, Generic[T]):
    """What the water of a coil says of its load.

    Attributes
    ----------
    load : float or numpy.ndarray
        Heat that the water took up, W; negative in a coil that heats.
    air_less_water : float or numpy.ndarray
        The load by the air less that by the water, W.
    """

    load: T
    air_less_water: T


@overload
def load_by_water(
    entering: AirStream[float],
    *,
    load_by_air: float,
    water_flow: float,
    entering_water: float,
    leaving_water: float,
    specific_heat: Union[Literal["water"], float] = ...,
) -> LoadByWater[float]: ...
@overload
def load_by_water(
    entering: AirStream[Any],
    *,
    load_by_air: ArrayLike,
    water_flow: ArrayLike,
    entering_water: ArrayLike,
    leaving_water: ArrayLike,
    specific_heat: Union[Literal["water"], ArrayLike] = ...,
) -> LoadByWater[Array]: ...
def load_by_water(
    entering: AirStream[Any],
    *,
    load_by_air: ArrayLike,
    water_flow: ArrayLike,
    entering_water: ArrayLike,
    leaving_water: ArrayLike,
    specific_heat: Union[Literal["water"], ArrayLike] = "water",
) -> LoadByWater[Any]:
    """The load of a coil by its water, beside its load by the air.

    A steady coil gives the same on both sides. Tests of coils ask for 5 % (ASHRAE 33, AHRI 410; from memory); meters of a
    plant seldom reach that (common practice, no source).

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    load_by_air : float or array_like
        Positive where the coil cools, W.
    water_flow : float or array_like
        kg/s.
    entering_water, leaving_water : float or array_like
        Temperatures of the water, °C.
    specific_heat
        As in `with_water`.

    Returns
    -------
    LoadByWater

    Raises
    ------
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, coil
    >>> air = MoistAir(dry_bulb=27.0, relative_humidity=0.5, pressure=101_325.0)
    >>> entering = AirStream(air, dry_air_flow=1.0)
    >>> found = coil.load_by_water(entering, load_by_air=25e3, water_flow=1.6, entering_water=6.0, leaving_water=9.6)
    >>> round(found.load / 1000.0, 1), round(found.air_less_water / 1000.0, 1)
    (24.2, 0.8)
    """
    expect(entering, AirStream, "entering")
    return run(
        "coil.load_by_water",
        LoadByWater,
        ("entering", entering),
        ("load_by_air", load_by_air),
        ("water_flow", water_flow),
        ("entering_water", entering_water),
        *choice(specific_heat, {"water": 0}, "specific_heat"),
        ("leaving_water", leaving_water),
    )


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
