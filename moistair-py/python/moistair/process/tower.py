"""Wet cooling towers: the overall balance of heat and water, how large a duty takes, what a tower does, the use of water.

Merkel's method (`merkel_number`, `merkel_rate`) is the basis of contracts; Poppe's (`poppe_rate`) gives evaporation and the
leaving air, fog included. A size found by one method is used with the same method.

Towers spread Legionella if they are not treated, cleaned and fitted with drift eliminators; basins and fills freeze in winter
before the mean cold water does: national hygiene rules, local codes and licensed practice govern. Not modeled: crossflow,
natural draft, by-pass, ice.
"""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Generic, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._core import MoistAir
from .._rows import Array, Record, T, expect, run
from ._streams import AirStream, Exchange
from ._tower_sizing import (
    FillLaw,
    MerkelNumber,
    Pinch,
    PoppeRating,
    TowerDirection,
    TowerRating,
    air_for_duty,
    basin_after,
    coldest_water,
    cycles_of_concentration,
    effectiveness_number,
    effectiveness_rate,
    evaporation_by_rule_of_thumb,
    fill_from_two_tests,
    fill_height,
    fill_number,
    merkel_number,
    merkel_pinch,
    merkel_rate,
    poppe_number,
    poppe_rate,
    water_to_air_ratio,
)

__all__ = [
    "FillLaw",
    "MerkelNumber",
    "Pinch",
    "PoppeRating",
    "TowerBalance",
    "TowerDirection",
    "TowerRating",
    "WaterUse",
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
    "water_use",
    "with_air_flow",
    "with_leaving_air",
]


@dataclass(frozen=True, eq=False, init=False)
class WaterUse(Record, Generic[T]):
    """Evaporation, drift, blowdown and what makes up for them; kg/s, all positive.

    Attributes
    ----------
    evaporation : float or numpy.ndarray
        Evaporation E.
    drift : float or numpy.ndarray
        Drift D.
    blowdown : float or numpy.ndarray
        Blowdown B = E / (C − 1) − D, not below zero.
    make_up : float or numpy.ndarray
        Make-up M = E + D + B.
    limited_by_drift : bool or numpy.ndarray
        Drift alone already keeps the concentration below the one wanted: no blowdown is needed.
    """

    evaporation: T
    drift: T
    blowdown: T
    make_up: T
    limited_by_drift: Union[bool, NDArray[np.bool_]]


@dataclass(frozen=True, eq=False, init=False)
class TowerBalance(Record, Generic[T]):
    """The overall balance of a tower.

    Attributes
    ----------
    leaving : AirStream
        The air that leaves.
    exchange : Exchange
        Heat and water into the air.
    heat_rejected : float or numpy.ndarray
        Heat that the water gives up, W, positive.
    water : WaterUse
        Water use.
    range : float or numpy.ndarray
        Hot over cold water, K.
    approach : float or numpy.ndarray
        Cold water over the wet bulb of the entering air, K.
    effectiveness : float or numpy.ndarray
        Range over range and approach; NaN without either.
    """

    leaving: AirStream[T]
    exchange: Exchange[T]
    heat_rejected: T
    water: WaterUse[T]
    range: T
    approach: T
    effectiveness: T


@overload
def water_use(
    *, evaporation: float, circulating_flow: float, drift_fraction: float, cycles_of_concentration: float
) -> WaterUse[float]: ...
@overload
def water_use(
    *, evaporation: ArrayLike, circulating_flow: ArrayLike, drift_fraction: ArrayLike, cycles_of_concentration: ArrayLike
) -> WaterUse[Array]: ...
def water_use(
    *, evaporation: ArrayLike, circulating_flow: ArrayLike, drift_fraction: ArrayLike, cycles_of_concentration: ArrayLike
) -> WaterUse[Any]:
    """Water use for an evaporation, a circulating flow and the treatment; also for humidifiers with bleed.

    Parameters
    ----------
    evaporation : float or array_like
        kg/s.
    circulating_flow : float or array_like
        kg/s.
    drift_fraction : float or array_like
        Drift over the circulating flow. With eliminators 0.000 05 to 0.0002, without up to 0.003 (common practice, no source).
    cycles_of_concentration : float or array_like
        Concentration of the circulating water over that of the make-up, above one.

    Returns
    -------
    WaterUse

    Raises
    ------
    InfeasibleError
        One cycle of concentration, which takes endless blowdown.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair.process import tower
    >>> used = tower.water_use(
    ...     evaporation=0.346, circulating_flow=15.0, drift_fraction=0.002, cycles_of_concentration=4.0
    ... )
    >>> round(used.make_up, 4)
    0.4613
    """
    return run(
        "tower.water_use",
        WaterUse,
        ("evaporation", evaporation),
        ("circulating_flow", circulating_flow),
        ("drift_fraction", drift_fraction),
        ("cycles_of_concentration", cycles_of_concentration),
    )


@overload
def with_air_flow(
    entering: AirStream[float],
    *,
    water_flow: float,
    hot_water: float,
    cold_water: float,
    drift_fraction: float,
    cycles_of_concentration: float,
) -> TowerBalance[float]: ...
@overload
def with_air_flow(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    drift_fraction: ArrayLike,
    cycles_of_concentration: ArrayLike,
) -> TowerBalance[Array]: ...
def with_air_flow(
    entering: AirStream[Any],
    *,
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    drift_fraction: ArrayLike,
    cycles_of_concentration: ArrayLike,
) -> TowerBalance[Any]:
    """Balance with a known air flow.

    The air is taken to leave saturated, which over-predicts evaporation where it does not. Without water the air
    leaves as it came: a tower at rest, whatever its thermometers read.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    water_flow : float or array_like
        Water that enters hot, kg/s.
    hot_water, cold_water : float or array_like
        Temperatures of the water, °C.
    drift_fraction, cycles_of_concentration : float or array_like
        As in `water_use`.

    Returns
    -------
    TowerBalance

    Raises
    ------
    InfeasibleError
        The water is not cooled, or so little air would leave warmer than the hot water.
    ProcessError
        No air flows.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    return run(
        "tower.with_air_flow",
        TowerBalance,
        ("entering", entering),
        ("water_flow", water_flow),
        ("hot_water", hot_water),
        ("cold_water", cold_water),
        ("drift_fraction", drift_fraction),
        ("cycles_of_concentration", cycles_of_concentration),
    )


@overload
def with_leaving_air(
    entering: MoistAir[float],
    *,
    leaving: MoistAir[float],
    water_flow: float,
    hot_water: float,
    cold_water: float,
    drift_fraction: float,
    cycles_of_concentration: float,
) -> TowerBalance[float]: ...
@overload
def with_leaving_air(
    entering: MoistAir[Any],
    *,
    leaving: MoistAir[Any],
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    drift_fraction: ArrayLike,
    cycles_of_concentration: ArrayLike,
) -> TowerBalance[Array]: ...
def with_leaving_air(
    entering: MoistAir[Any],
    *,
    leaving: MoistAir[Any],
    water_flow: ArrayLike,
    hot_water: ArrayLike,
    cold_water: ArrayLike,
    drift_fraction: ArrayLike,
    cycles_of_concentration: ArrayLike,
) -> TowerBalance[Any]:
    """Balance with a known leaving state: the dry-air flow that it takes is that of the leaving stream.

    Parameters
    ----------
    entering, leaving : MoistAir
        States of the air.
    water_flow : float or array_like
        Water that enters hot, kg/s.
    hot_water, cold_water : float or array_like
        Temperatures of the water, °C.
    drift_fraction, cycles_of_concentration : float or array_like
        As in `water_use`.

    Returns
    -------
    TowerBalance

    Raises
    ------
    InfeasibleError
        The leaving air carries no more than the entering.
    ProcessError
        States of different formulations, or no air flows.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, MoistAir, "entering")
    expect(leaving, MoistAir, "leaving")
    return run(
        "tower.with_leaving_air",
        TowerBalance,
        ("entering", entering),
        ("leaving", leaving),
        ("water_flow", water_flow),
        ("hot_water", hot_water),
        ("cold_water", cold_water),
        ("drift_fraction", drift_fraction),
        ("cycles_of_concentration", cycles_of_concentration),
    )
