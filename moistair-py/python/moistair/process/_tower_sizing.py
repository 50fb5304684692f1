"""Cooling towers of a given size: how large a duty takes, and what a tower does, in counterflow.

A size found by one method is used with the same method: Poppe's number for one test is 7 to 15 % above Merkel's. A few
tenths of a kelvin of cold water is the best that any method does against a tower. Not modeled: crossflow, natural draft and
still fans, poor distribution of water, ice.

Towers spread Legionella if they are not treated, cleaned and fitted with drift eliminators; basins and fills freeze in winter
before the mean cold water does: local codes and licensed practice govern.
"""

from __future__ import annotations

import enum
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._core import MoistAir
from .._rows import Array, Record, T, expect, run
from ._streams import AirStream, Exchange, WetStream, code

__all__ = [
    "FillLaw",
    "MerkelNumber",
    "Pinch",
    "PoppeRating",
    "TowerDirection",
    "TowerRating",
    "air_for_duty",
    "basin_after",
    "coldest_water",
    "cycles_of_concentration",
    "effectiveness_number",
    "effectiveness_rate",
    "evaporation_by_rule_of_thumb",
    "fill_from_two_tests",
    "fill_height",
    "fill_number",
    "merkel_number",
    "merkel_pinch",
    "merkel_rate",
    "poppe_number",
    "poppe_rate",
    "water_to_air_ratio",
]

#: How the Merkel integral is evaluated; "four_point" is the rule of the trade, for comparison with contracts.
Quadrature = Union[Literal["gauss_legendre"], Literal["gauss_legendre_graded"], Literal["four_point"]]

#: How heat and vapor share the way in Poppe's method; "evaporation_suppressed" is a check against Merkel's, no tower.
Transfer = Union[Literal["bosnjakovic"], Literal["lewis_factor_one"], Literal["evaporation_suppressed"]]

_QUADRATURE = {"gauss_legendre": 0, "gauss_legendre_graded": 1, "four_point": 2}
_TRANSFER = {"bosnjakovic": 0, "lewis_factor_one": 1, "evaporation_suppressed": 2}


class TowerDirection(enum.IntEnum):
    """Which way the heat goes."""

    COOLING = 0
    """The air cools the water."""
    REVERSED = 1
    """The water enters colder than the limit that the air sets, and is warmed."""


@dataclass(frozen=True, eq=False, init=False)
class Pinch(Record, Generic[T]):
    """The least air that can do a duty, with a tower without end.

    Attributes
    ----------
    water_to_air : float or numpy.ndarray
        The greatest L/G; 20 where nothing pinches.
    temperature : float or numpy.ndarray
        Water temperature where the enthalpies of air and film meet, °C.
    """

    water_to_air: T
    temperature: T


@dataclass(frozen=True, eq=False, init=False)
class MerkelNumber(Record, Generic[T]):
    """How much transfer a duty takes.

    Attributes
    ----------
    number : float or numpy.ndarray
        Me = K a V / L.
    water_to_air : float or numpy.ndarray
        L/G, water over dry air.
    pinch : Pinch
        Where the driving force would vanish with less air.
    heat_rejected : float or numpy.ndarray
        Heat that the water gives up, W.
    leaving_enthalpy : float or numpy.ndarray
        Enthalpy of the leaving air, J per kg of dry air.
    """

    number: T
    water_to_air: T
    pinch: Pinch[T]
    heat_rejected: T
    leaving_enthalpy: T


@dataclass(frozen=True, eq=False, init=False)
class TowerRating(Record, Generic[T]):
    """What a tower does to the water; of the leaving air only the enthalpy is known.

    Attributes
    ----------
    cold_water : float or numpy.ndarray
        Temperature at which the water leaves, °C.
    heat_rejected : float or numpy.ndarray
        Heat that the water gives up, W; negative where the tower is reversed.
    leaving_enthalpy : float or numpy.ndarray
        Enthalpy of the leaving air, J per kg of dry air.
    water_to_air : float or numpy.ndarray
        L/G, water over dry air.
    range : float or numpy.ndarray
        Hot over cold water, K.
    approach : float or numpy.ndarray
        Cold water over the wet bulb of the entering air, K.
    effectiveness : float or numpy.ndarray
        Range over range and approach; NaN without either.
    direction : TowerDirection or numpy.ndarray
        Which way the heat goes.
    """

    cold_water: T
    heat_rejected: T
    leaving_enthalpy: T
    water_to_air: T
    range: T
    approach: T
    effectiveness: T
    direction: Union[TowerDirection, NDArray[np.int32]]


@dataclass(frozen=True, eq=False, init=False)
class PoppeRating(Record, Generic[T]):
    """What a tower does to water and air, by Poppe's method.

    Attributes
    ----------
    leaving : WetStream
        The air that leaves, with the droplets of its fog.
    exchange : Exchange
        Heat and water into the air.
    cold_water : float or numpy.ndarray
        Temperature at which the water leaves, °C.
    evaporation : float or numpy.ndarray
        Water into the air, kg/s; negative where vapor condenses on the water.
    heat_rejected : float or numpy.ndarray
        Heat that the water gives up, W; negative where the tower is reversed.
    water_to_air : float or numpy.ndarray
        L/G, water over dry air.
    range : float or numpy.ndarray
        Hot over cold water, K.
    approach : float or numpy.ndarray
        Cold water over the wet bulb of the entering air, K.
    effectiveness : float or numpy.ndarray
        Range over range and approach; NaN without either.
    direction : TowerDirection or numpy.ndarray
        Which way the heat goes.
    is_fogged : bool or numpy.ndarray
        Whether the leaving air carries fog.
    """

    leaving: WetStream[T]
    exchange: Exchange[T]
    cold_water: T
    evaporation: T
    heat_rejected: T
    water_to_air: T
    range: T
    approach: T
    effectiveness: T
    direction: Union[TowerDirection, NDArray[np.int32]]
    is_fogged: Union[bool, NDArray[np.bool_]]


@dataclass(frozen=True, eq=False, init=False)
class FillLaw(Record, Generic[T]):
    """What a fill transfers: Me = c (L/G)^−n, near the L/G, the height and the spray of its tests.

    Attributes
    ----------
    coefficient : float or numpy.ndarray
        c.
    exponent : float or numpy.ndarray
        n.
    """

    coefficient: T
    exponent: T


@overload
def air_for_duty(
    air: MoistAir[float],
    *,
    water_flow: float,
    hot_water: float,
    cold_water: float,
    coefficient: float,
    exponent: float,
) -> AirStream[float]: ...
@overload
def air_for_duty(
    air: MoistAir[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    coefficient: ArrayLike,
    exponent: ArrayLike,
) -> AirStream[Array]: ...
def air_for_duty(
    air: MoistAir[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    coefficient: ArrayLike,
    exponent: ArrayLike,
) -> AirStream[Any]:
    """The dry-air flow with which a fill does a duty: what the fan must move.

    Parameters
    ----------
    air : MoistAir
        State of the air that enters.
    water_flow : float or array_like
        Water that enters hot, kg/s.
    hot_water : float or array_like
        Temperature of the water that enters, °C.
    cold_water : float or array_like
        Temperature at which the water leaves, °C.
    coefficient : float or array_like
        c of the fill.
    exponent : float or array_like
        n of the fill.

    Returns
    -------
    AirStream

    Raises
    ------
    InfeasibleError
        The fill is too small with any air or does the duty with next to none; the cold water is at or below its limit.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(air, MoistAir, "air")
    return run(
        "tower.air_for_duty",
        AirStream,
        ("air", air),
        ("water_flow", water_flow),
        ("hot_water", hot_water),
        ("cold_water", cold_water),
        ("coefficient", coefficient),
        ("exponent", exponent),
    )


@overload
def basin_after(
    *,
    concentration: float,
    inventory: float,
    duration: float,
    blowdown: float,
    drift: float,
    make_up_flow: float,
    make_up_concentration: float,
) -> float: ...
@overload
def basin_after(
    *,
    concentration: ArrayLike,
    inventory: ArrayLike,
    duration: ArrayLike,
    blowdown: ArrayLike,
    drift: ArrayLike,
    make_up_flow: ArrayLike,
    make_up_concentration: ArrayLike,
) -> Array: ...
def basin_after(
    *,
    concentration: ArrayLike,
    inventory: ArrayLike,
    duration: ArrayLike,
    blowdown: ArrayLike,
    drift: ArrayLike,
    make_up_flow: ArrayLike,
    make_up_concentration: ArrayLike,
) -> Any:
    """Concentration of the circulating water after a step with steady flows; exact however long.

    Parameters
    ----------
    concentration : float or array_like
        Of the circulating water, mg/kg or any unit that that of the make-up is in too.
    inventory : float or array_like
        Water in basin, pipes and plant together, kg.
    duration : float or array_like
        s; as long as the flows are steady.
    blowdown : float or array_like
        kg/s.
    drift : float or array_like
        kg/s.
    make_up_flow : float or array_like
        kg/s.
    make_up_concentration : float or array_like
        In the unit of `concentration`.

    Returns
    -------
    float or numpy.ndarray
        NaN where a row of an array has no result.

    Raises
    ------
    InfeasibleError
        The concentration would leave its range.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair.process import tower
    >>> round(tower.basin_after(concentration=500.0, inventory=8000.0, duration=36_000.0, blowdown=0.0853, drift=0.03,
    ...                         make_up_flow=0.4613, make_up_concentration=500.0))
    1107
    """
    return run(
        "tower.basin_after",
        float,
        ("concentration", concentration),
        ("inventory", inventory),
        ("duration", duration),
        ("blowdown", blowdown),
        ("drift", drift),
        ("make_up_flow", make_up_flow),
        ("make_up_concentration", make_up_concentration),
    )


@overload
def coldest_water(air: MoistAir[float]) -> float: ...
@overload
def coldest_water(air: MoistAir[Any]) -> Array: ...
def coldest_water(air: MoistAir[Any]) -> Any:
    """The limit of cold water, °C: where saturated air has the enthalpy of the entering air; a little below the wet bulb.

    Parameters
    ----------
    air : MoistAir
        State of the air that enters.

    Returns
    -------
    float or numpy.ndarray
        NaN where a row of an array has no result.

    Raises
    ------
    InfeasibleError
        It would lie below −40 °C, or above all water here.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> import moistair
    >>> from moistair.process import tower
    >>> air = moistair.MoistAir(dry_bulb=35.0, relative_humidity=0.2, pressure=101_325.0, formulation="ideal_gas")
    >>> round(tower.coldest_water(air), 2)
    18.71
    """
    expect(air, MoistAir, "air")
    return run("tower.coldest_water", float, ("air", air))


@overload
def cycles_of_concentration(*, circulating: float, make_up: float) -> float: ...
@overload
def cycles_of_concentration(*, circulating: ArrayLike, make_up: ArrayLike) -> Array: ...
def cycles_of_concentration(*, circulating: ArrayLike, make_up: ArrayLike) -> Any:
    """Cycles of concentration as measured.

    Parameters
    ----------
    circulating : float or array_like
        Concentration or conductivity of the circulating water.
    make_up : float or array_like
        The same of the make-up, in the same unit.

    Returns
    -------
    float or numpy.ndarray
        NaN where a row of an array has no result.

    Raises
    ------
    InfeasibleError
        The circulating water is not the more concentrated.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair.process import tower
    >>> tower.cycles_of_concentration(circulating=2000.0, make_up=500.0)
    4.0
    """
    return run("tower.cycles_of_concentration", float, ("circulating", circulating), ("make_up", make_up))


@overload
def effectiveness_number(
    entering: AirStream[float],
    *,
    water_flow: float,
    hot_water: float,
    cold_water: float,
) -> float: ...
@overload
def effectiveness_number(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
) -> Array: ...
def effectiveness_number(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
) -> Any:
    """The Merkel number that a duty takes, by effectiveness and transfer units.

    After Jaber and Webb 1989; 1 to 3 % below Merkel's; for ranges up to some 15 K.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        Water that enters hot, kg/s.
    hot_water : float or array_like
        Temperature of the water that enters, °C.
    cold_water : float or array_like
        Temperature at which the water leaves, °C.

    Returns
    -------
    float or numpy.ndarray
        NaN where a row of an array has no result.

    Raises
    ------
    InfeasibleError
        No counterflow does this duty.
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    return run(
        "tower.effectiveness_number",
        float,
        ("entering", entering),
        ("water_flow", water_flow),
        ("hot_water", hot_water),
        ("cold_water", cold_water),
    )


@overload
def effectiveness_rate(
    entering: AirStream[float],
    *,
    water_flow: float,
    hot_water: float,
    number: float,
) -> TowerRating[float]: ...
@overload
def effectiveness_rate(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    number: ArrayLike,
) -> TowerRating[Array]: ...
def effectiveness_rate(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    number: ArrayLike,
) -> TowerRating[Any]:
    """The cold water of a tower, by effectiveness and transfer units.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        Water that enters hot, kg/s.
    hot_water : float or array_like
        Temperature of the water that enters, °C.
    number : float or array_like
        Merkel number, found by the same method; 0 to 20.

    Returns
    -------
    TowerRating

    Raises
    ------
    InfeasibleError
        The water would freeze or boil, or enters below the limit of the air.
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    return run(
        "tower.effectiveness_rate",
        TowerRating,
        ("entering", entering),
        ("water_flow", water_flow),
        ("hot_water", hot_water),
        ("number", number),
    )


@overload
def evaporation_by_rule_of_thumb(*, circulating_flow: float, water_range: float) -> float: ...
@overload
def evaporation_by_rule_of_thumb(*, circulating_flow: ArrayLike, water_range: ArrayLike) -> Array: ...
def evaporation_by_rule_of_thumb(*, circulating_flow: ArrayLike, water_range: ArrayLike) -> Any:
    """Evaporation, kg/s, as 0.00153 of the circulating flow for each kelvin of range (common practice, no source).

    The balances give from 0.0012 to 0.0023.

    Parameters
    ----------
    circulating_flow : float or array_like
        kg/s.
    water_range : float or array_like
        Hot over cold water, K.

    Returns
    -------
    float or numpy.ndarray
        NaN where a row of an array has no result.

    Raises
    ------
    NotFiniteError, OutOfRangeError
        An input.
    """
    return run(
        "tower.evaporation_by_rule_of_thumb",
        float,
        ("circulating_flow", circulating_flow),
        ("water_range", water_range),
    )


@overload
def fill_from_two_tests(
    *,
    first_water_to_air: float,
    first_number: float,
    second_water_to_air: float,
    second_number: float,
) -> FillLaw[float]: ...
@overload
def fill_from_two_tests(
    *,
    first_water_to_air: ArrayLike,
    first_number: ArrayLike,
    second_water_to_air: ArrayLike,
    second_number: ArrayLike,
) -> FillLaw[Array]: ...
def fill_from_two_tests(
    *,
    first_water_to_air: ArrayLike,
    first_number: ArrayLike,
    second_water_to_air: ArrayLike,
    second_number: ArrayLike,
) -> FillLaw[Any]:
    """The law of a fill through two tests.

    Parameters
    ----------
    first_water_to_air : float or array_like
        L/G of the first test.
    first_number : float or array_like
        Merkel number of the first test.
    second_water_to_air : float or array_like
        L/G of the second test.
    second_number : float or array_like
        Merkel number of the second test.

    Returns
    -------
    FillLaw

    Raises
    ------
    InfeasibleError
        Tests at one L/G, or an exponent outside 0 to 2.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair.process import tower
    >>> law = tower.fill_from_two_tests(
    ...     first_water_to_air=0.8, first_number=1.9, second_water_to_air=1.6, second_number=1.25
    ... )
    >>> round(law.exponent, 3)
    0.604
    """
    return run(
        "tower.fill_from_two_tests",
        FillLaw,
        ("first_water_to_air", first_water_to_air),
        ("first_number", first_number),
        ("second_water_to_air", second_water_to_air),
        ("second_number", second_number),
    )


@overload
def fill_height(
    *,
    coefficient: float,
    exponent: float,
    number: float,
    water_to_air: float,
    tested_height: float,
) -> float: ...
@overload
def fill_height(
    *,
    coefficient: ArrayLike,
    exponent: ArrayLike,
    number: ArrayLike,
    water_to_air: ArrayLike,
    tested_height: ArrayLike,
) -> Array: ...
def fill_height(
    *,
    coefficient: ArrayLike,
    exponent: ArrayLike,
    number: ArrayLike,
    water_to_air: ArrayLike,
    tested_height: ArrayLike,
) -> Any:
    """The height, m, that a Merkel number takes, of a fill tested at a height.

    Parameters
    ----------
    coefficient : float or array_like
        c of the fill.
    exponent : float or array_like
        n of the fill.
    number : float or array_like
        Merkel number, found by the same method; 0 to 20.
    water_to_air : float or array_like
        L/G, water over dry air.
    tested_height : float or array_like
        Height of the fill in its tests, m.

    Returns
    -------
    float or numpy.ndarray
        NaN where a row of an array has no result.

    Raises
    ------
    InfeasibleError
        The height would leave its range.
    NotFiniteError, OutOfRangeError
        An input.
    """
    return run(
        "tower.fill_height",
        float,
        ("coefficient", coefficient),
        ("exponent", exponent),
        ("number", number),
        ("water_to_air", water_to_air),
        ("tested_height", tested_height),
    )


@overload
def fill_number(*, coefficient: float, exponent: float, water_to_air: float) -> float: ...
@overload
def fill_number(*, coefficient: ArrayLike, exponent: ArrayLike, water_to_air: ArrayLike) -> Array: ...
def fill_number(*, coefficient: ArrayLike, exponent: ArrayLike, water_to_air: ArrayLike) -> Any:
    """Merkel number of a fill at a ratio of water to air.

    Parameters
    ----------
    coefficient : float or array_like
        c of the fill.
    exponent : float or array_like
        n of the fill.
    water_to_air : float or array_like
        L/G, water over dry air.

    Returns
    -------
    float or numpy.ndarray
        NaN where a row of an array has no result.

    Raises
    ------
    InfeasibleError
        The law leaves the range of the number.
    NotFiniteError, OutOfRangeError
        An input.
    """
    return run(
        "tower.fill_number",
        float,
        ("coefficient", coefficient),
        ("exponent", exponent),
        ("water_to_air", water_to_air),
    )


@overload
def merkel_number(
    entering: AirStream[float],
    *,
    water_flow: float,
    hot_water: float,
    cold_water: float,
    quadrature: Quadrature = ...,
) -> MerkelNumber[float]: ...
@overload
def merkel_number(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    quadrature: Quadrature = ...,
) -> MerkelNumber[Array]: ...
def merkel_number(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    quadrature: Quadrature = "gauss_legendre",
) -> MerkelNumber[Any]:
    """The Merkel number that a duty takes.

    Gauss–Legendre is good to 1e-8 in common cooling practice, the rule of the trade to 2e-3.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        Water that enters hot, kg/s.
    hot_water : float or array_like
        Temperature of the water that enters, °C.
    cold_water : float or array_like
        Temperature at which the water leaves, °C.
    quadrature : {'gauss_legendre', 'gauss_legendre_graded', 'four_point'}
        How the integral is evaluated; graded for duties next to the limit or the pinch.

    Returns
    -------
    MerkelNumber

    Raises
    ------
    InfeasibleError
        Beyond the pinch (the error holds the greatest L/G), cold water at or below its limit, or water that is not cooled.
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> import moistair
    >>> from moistair.process import AirStream, tower
    >>> air = moistair.MoistAir(dry_bulb=24.0, relative_humidity=1.0, pressure=101_325.0, formulation="ideal_gas")
    >>> entering = AirStream(air, dry_air_flow=10.0)
    >>> needed = tower.merkel_number(entering, water_flow=12.0, hot_water=39.0, cold_water=29.0)
    >>> round(needed.number, 5)
    1.60834
    """
    expect(entering, AirStream, "entering")
    return run(
        "tower.merkel_number",
        MerkelNumber,
        ("entering", entering),
        ("water_flow", water_flow),
        ("hot_water", hot_water),
        ("cold_water", cold_water),
        code(_QUADRATURE, quadrature, "quadrature"),
    )


@overload
def merkel_pinch(air: MoistAir[float], *, hot_water: float, cold_water: float) -> Pinch[float]: ...
@overload
def merkel_pinch(air: MoistAir[Any], *, hot_water: ArrayLike, cold_water: ArrayLike) -> Pinch[Array]: ...
def merkel_pinch(air: MoistAir[Any], *, hot_water: ArrayLike, cold_water: ArrayLike) -> Pinch[Any]:
    """The greatest ratio of water to air with which a duty can be done at all.

    Parameters
    ----------
    air : MoistAir
        State of the air that enters.
    hot_water : float or array_like
        Temperature of the water that enters, °C.
    cold_water : float or array_like
        Temperature at which the water leaves, °C.

    Returns
    -------
    Pinch

    Raises
    ------
    InfeasibleError
        The cold water is at or below its limit, or not below the hot.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(air, MoistAir, "air")
    return run("tower.merkel_pinch", Pinch, ("air", air), ("hot_water", hot_water), ("cold_water", cold_water))


@overload
def merkel_rate(
    entering: AirStream[float],
    *,
    water_flow: float,
    hot_water: float,
    number: float,
) -> TowerRating[float]: ...
@overload
def merkel_rate(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    number: ArrayLike,
) -> TowerRating[Array]: ...
def merkel_rate(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    number: ArrayLike,
) -> TowerRating[Any]:
    """The cold water of a tower of a given Merkel number.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        Water that enters hot, kg/s.
    hot_water : float or array_like
        Temperature of the water that enters, °C.
    number : float or array_like
        Merkel number, found by the same method; 0 to 20.

    Returns
    -------
    TowerRating

    Raises
    ------
    InfeasibleError
        The water would freeze (the error holds the greatest number that does not freeze it) or boil.
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    return run(
        "tower.merkel_rate",
        TowerRating,
        ("entering", entering),
        ("water_flow", water_flow),
        ("hot_water", hot_water),
        ("number", number),
    )


@overload
def poppe_number(
    entering: AirStream[float],
    *,
    water_flow: float,
    hot_water: float,
    cold_water: float,
    transfer: Transfer = ...,
) -> float: ...
@overload
def poppe_number(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    transfer: Transfer = ...,
) -> Array: ...
def poppe_number(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    transfer: Transfer = "bosnjakovic",
) -> Any:
    """The number that a duty takes, by Poppe's method: for tests of fills.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        Water that enters hot, kg/s.
    hot_water : float or array_like
        Temperature of the water that enters, °C.
    cold_water : float or array_like
        Temperature at which the water leaves, °C.
    transfer : {'bosnjakovic', 'lewis_factor_one', 'evaporation_suppressed'}
        How heat and vapor share the way.

    Returns
    -------
    float or numpy.ndarray
        NaN where a row of an array has no result.

    Raises
    ------
    InfeasibleError
        Water that is not cooled, or that no tower cools so far with these flows.
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    return run(
        "tower.poppe_number",
        float,
        ("entering", entering),
        ("water_flow", water_flow),
        ("hot_water", hot_water),
        ("cold_water", cold_water),
        code(_TRANSFER, transfer, "transfer"),
    )


@overload
def poppe_rate(
    entering: AirStream[float],
    *,
    water_flow: float,
    hot_water: float,
    number: float,
    transfer: Transfer = ...,
) -> PoppeRating[float]: ...
@overload
def poppe_rate(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    number: ArrayLike,
    transfer: Transfer = ...,
) -> PoppeRating[Array]: ...
def poppe_rate(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    number: ArrayLike,
    transfer: Transfer = "bosnjakovic",
) -> PoppeRating[Any]:
    """Cold water, leaving air and evaporation of a tower of a given number, by Poppe's method.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        Water that enters hot, kg/s.
    hot_water : float or array_like
        Temperature of the water that enters, °C.
    number : float or array_like
        Merkel number, found by the same method; 0 to 20.
    transfer : {'bosnjakovic', 'lewis_factor_one', 'evaporation_suppressed'}
        How heat and vapor share the way.

    Returns
    -------
    PoppeRating

    Raises
    ------
    InfeasibleError
        The water would freeze or boil, or all of it evaporate.
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> import moistair
    >>> from moistair.process import AirStream, tower
    >>> air = moistair.MoistAir(dry_bulb=25.0, wet_bulb=19.0, pressure=101_325.0, formulation="ideal_gas")
    >>> entering = AirStream(air, dry_air_flow=6.0)
    >>> rated = tower.poppe_rate(entering, water_flow=10.0, hot_water=38.0, number=1.5)
    >>> round(rated.cold_water, 3), round(rated.evaporation, 4), rated.is_fogged
    (28.262, 0.1437, True)
    """
    expect(entering, AirStream, "entering")
    return run(
        "tower.poppe_rate",
        PoppeRating,
        ("entering", entering),
        ("water_flow", water_flow),
        ("hot_water", hot_water),
        ("number", number),
        code(_TRANSFER, transfer, "transfer"),
    )


@overload
def water_to_air_ratio(entering: AirStream[float], *, water_flow: float) -> float: ...
@overload
def water_to_air_ratio(entering: AirStream[Any], *, water_flow: ArrayLike) -> Array: ...
def water_to_air_ratio(entering: AirStream[Any], *, water_flow: ArrayLike) -> Any:
    """L/G: the entering water over the dry air.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        Water that enters hot, kg/s.

    Returns
    -------
    float or numpy.ndarray
        NaN where a row of an array has no result.

    Raises
    ------
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    return run("tower.water_to_air_ratio", float, ("entering", entering), ("water_flow", water_flow))
