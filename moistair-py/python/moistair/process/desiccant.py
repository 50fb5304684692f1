"""Drying by a desiccant: along the line of adiabatic sorption, and in a wheel that hot air regenerates.

Sorbed water gives off more heat than it would by condensing, `sorption_heat_ratio` times as much, which stays in the air:
c_p (t₂ − t₁) = (W₁ − W₂) k h_fg. About 1.05 to 1.15 for silica gel, 1.2 and more for zeolites (common practice, no source).
Left out: leakage and purge, start-up, aging and fouling, liquid desiccants.

Regeneration air of 60 to 150 °C burns, scorches dust and lint, and can ignite them: makers' instructions, over-temperature
cut-outs in hardware and fire codes govern, as they do the solvents that a desiccant collects and sets free again when it
is heated. Wet regeneration exhaust condenses in cold ducts and grows mould there, as supply ducts kept above about 80 to
90 % relative humidity do (common practice, no source). Local codes and licensed practice govern; nothing here is a safety
function.
"""

from __future__ import annotations

import enum
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._core import MoistAir
from .._rows import Array, Record, T, expect, run
from ._streams import AirStream, Exchange, code
from .sensible import Sensible

__all__ = [
    "CorrelationStatus",
    "Effectiveness",
    "Imbalance",
    "PotentialWheel",
    "Potentials",
    "Sorbed",
    "Wheel",
    "WheelStatus",
    "by_effectiveness",
    "effectiveness_between",
    "potentials",
    "to_humidity_ratio",
    "wheel",
    "wheel_by_potentials",
]

#: What the matrix of a wheel carries over: nothing, a heat flow into the air (W), or what warms the leaving air by so much (K).
CarryOver = Union[Literal["none"], Literal["heat"], Literal["rise"]]

#: What is known of the heater that regenerates a wheel: its heat (W), or the temperature of the air before or behind the wheel.
Heater = Union[Literal["heat"], Literal["entering_temperature"], Literal["leaving_temperature"]]

_CARRY_OVER = {"none": 0, "heat": 1, "rise": 2}
_HEATER = {"heat": 0, "entering_temperature": 1, "leaving_temperature": 2}


class WheelStatus(enum.IntEnum):
    """Whether a wheel can be what was asked."""

    POSSIBLE = 0
    """Nothing forbids it."""
    AGAINST_SECOND_LAW = 1
    """It would destroy entropy: no wheel does this with this regeneration, which has to be hotter, drier or more."""


class CorrelationStatus(enum.IntEnum):
    """Whether the correlation of the potentials was made for this."""

    WITHIN = 0
    """Within its range."""
    OFF_STANDARD_PRESSURE = 1
    """The pressure is more than 5 % off 101 325 Pa, for which humidity ratio stands for vapor pressure in it."""


@dataclass(frozen=True, eq=False, init=False)
class Sorbed(Record, Generic[T]):
    """Air that gave water to a desiccant, or took it back.

    Attributes
    ----------
    leaving : AirStream
        The air that leaves.
    exchange : Exchange
        The heat carried over, and the water with what is left of its enthalpy.
    removed : float or numpy.ndarray
        Water that went into the desiccant, kg/s; negative where it came out.
    sorption_heat : float or numpy.ndarray
        Heat of sorption that the air took up, W.
    carried_heat : float or numpy.ndarray
        Heat that the matrix carried over, W.
    """

    leaving: AirStream[T]
    exchange: Exchange[T]
    removed: T
    sorption_heat: T
    carried_heat: T


@dataclass(frozen=True, eq=False, init=False)
class Wheel(Record, Generic[T]):
    """A desiccant wheel with the heater of its regeneration.

    Attributes
    ----------
    process : Sorbed
        The side that is dried.
    heater : Sensible
        The heater in the regeneration air; its leaving air enters the wheel.
    regeneration : AirStream
        The regeneration air behind the wheel.
    regeneration_exchange : Exchange
        What the wheel gave to it.
    regeneration_heat : float or numpy.ndarray
        Heat of the regeneration, W.
    heat_per_water : float or numpy.ndarray
        Heat of the regeneration per water removed, J/kg; NaN where none is.
    entropy_production : float or numpy.ndarray
        Entropy that the wheel produces, W/K; below zero against the second law.
    wheel : WheelStatus or numpy.ndarray
        What that means; an int32 array of the codes for many rows, −1 where a row has no result.
    """

    process: Sorbed[T]
    heater: Sensible[T]
    regeneration: AirStream[T]
    regeneration_exchange: Exchange[T]
    regeneration_heat: T
    heat_per_water: T
    entropy_production: T
    wheel: Union[WheelStatus, NDArray[np.int32]]


@dataclass(frozen=True, eq=False, init=False)
class Potentials(Record, Generic[T]):
    """The two potentials of air over silica gel.

    Attributes
    ----------
    first : float or numpy.ndarray
        F₁, near enthalpy.
    second : float or numpy.ndarray
        F₂, near relative humidity.
    """

    first: T
    second: T


@dataclass(frozen=True, eq=False, init=False)
class Effectiveness(Record, Generic[T]):
    """How far a wheel leads the process air toward the regeneration air.

    Attributes
    ----------
    first : float or numpy.ndarray
        In F₁, the less the better.
    second : float or numpy.ndarray
        In F₂, the more the better.
    """

    first: T
    second: T


@dataclass(frozen=True, eq=False, init=False)
class Imbalance(Record, Generic[T]):
    """What the potentials leave over where the regeneration air too is led by them: how far to trust them.

    Attributes
    ----------
    heat : float or numpy.ndarray
        Heat that both streams leave with beyond what they entered with, W; NaN where the potentials give no state.
    water : float or numpy.ndarray
        Water, likewise, kg/s.
    """

    heat: T
    water: T


@dataclass(frozen=True, eq=False, init=False)
class PotentialWheel(Record, Generic[T]):
    """A wheel by its potentials.

    Attributes
    ----------
    process : AirStream
        The process air behind the wheel.
    exchange : Exchange
        What it exchanged.
    regeneration : AirStream
        The regeneration air behind the wheel, by the balance of both sides.
    regeneration_exchange : Exchange
        What it exchanged.
    removed : float or numpy.ndarray
        Water that went from the process to the regeneration air, kg/s; negative where it went the other way.
    imbalance : Imbalance
        What the potentials leave over.
    entropy_production : float or numpy.ndarray
        Entropy that the wheel produces, W/K.
    wheel : WheelStatus or numpy.ndarray
        What that means; an int32 array of the codes for many rows, −1 where a row has no result.
    correlation : CorrelationStatus or numpy.ndarray
        Whether the correlation was made for this.
    """

    process: AirStream[T]
    exchange: Exchange[T]
    regeneration: AirStream[T]
    regeneration_exchange: Exchange[T]
    removed: T
    imbalance: Imbalance[T]
    entropy_production: T
    wheel: Union[WheelStatus, NDArray[np.int32]]
    correlation: Union[CorrelationStatus, NDArray[np.int32]]


def _sorption(heat_ratio: Any, carried: Any, carry_over: Any) -> tuple[tuple[str, Any], ...]:
    return (
        ("sorption_heat_ratio", heat_ratio),
        ("carry_over", code(_CARRY_OVER, carry_over, "carry_over")[1]),
        ("carry_over.value", carried),
    )


@overload
def to_humidity_ratio(
    entering: AirStream[float],
    *,
    target: float,
    sorption_heat_ratio: float,
    carried: float = ...,
    carry_over: CarryOver = ...,
) -> Sorbed[float]: ...
@overload
def to_humidity_ratio(
    entering: AirStream[Any],
    *,
    target: ArrayLike,
    sorption_heat_ratio: ArrayLike,
    carried: ArrayLike = ...,
    carry_over: CarryOver = ...,
) -> Sorbed[Array]: ...
def to_humidity_ratio(
    entering: AirStream[Any],
    *,
    target: ArrayLike,
    sorption_heat_ratio: ArrayLike,
    carried: ArrayLike = 0.0,
    carry_over: CarryOver = "none",
) -> Sorbed[Any]:
    """Leads air along the line of sorption to a humidity ratio; a moister target runs it backwards, as in regeneration.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    target : float or array_like
        Humidity ratio to be reached, kg/kg.
    sorption_heat_ratio : float or array_like
        Heat of sorption over heat of vaporization, 0.5 to 3.
    carried : float or array_like
        What the matrix carries over, W for `heat`, K for `rise`.
    carry_over : {'none', 'heat', 'rise'}
        What `carried` is.

    Returns
    -------
    Sorbed

    Raises
    ------
    InfeasibleError
        The leaving air would be fog or outside the range of states, or the air enters below −40 °C.
    ProcessError
        No flow.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    6 g/kg of drying warm the air by 16 K.

    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, desiccant
    >>> air = MoistAir(dry_bulb=25.0, humidity_ratio=0.012, pressure=101_325.0)
    >>> done = desiccant.to_humidity_ratio(AirStream(air, dry_air_flow=1.0), target=0.006, sorption_heat_ratio=1.1)
    >>> round(done.leaving.air.dry_bulb)
    41
    """
    expect(entering, AirStream, "entering")
    return run(
        "desiccant.to_humidity_ratio",
        Sorbed,
        ("entering", entering),
        ("target", target),
        *_sorption(sorption_heat_ratio, carried, carry_over),
    )


@overload
def by_effectiveness(
    entering: AirStream[float],
    *,
    effectiveness: float,
    sorption_heat_ratio: float,
    driest: float = ...,
    carried: float = ...,
    carry_over: CarryOver = ...,
) -> Sorbed[float]: ...
@overload
def by_effectiveness(
    entering: AirStream[Any],
    *,
    effectiveness: ArrayLike,
    sorption_heat_ratio: ArrayLike,
    driest: ArrayLike = ...,
    carried: ArrayLike = ...,
    carry_over: CarryOver = ...,
) -> Sorbed[Array]: ...
def by_effectiveness(
    entering: AirStream[Any],
    *,
    effectiveness: ArrayLike,
    sorption_heat_ratio: ArrayLike,
    driest: ArrayLike = 0.0,
    carried: ArrayLike = 0.0,
    carry_over: CarryOver = "none",
) -> Sorbed[Any]:
    """Dries by an effectiveness on humidity ratio, (W₁ − W₂) / (W₁ − driest).

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    effectiveness : float or array_like
        Fraction, 0 to 1.
    sorption_heat_ratio : float or array_like
        Heat of sorption over heat of vaporization, 0.5 to 3.
    driest : float or array_like
        Humidity ratio that the desiccant could reach at best, kg/kg; 0 for the common definition.
    carried : float or array_like
        What the matrix carries over, W for `heat`, K for `rise`.
    carry_over : {'none', 'heat', 'rise'}
        What `carried` is.

    Returns
    -------
    Sorbed

    Raises
    ------
    InfeasibleError
        The air enters drier than `driest`, or as `to_humidity_ratio`.
    ProcessError
        No flow.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    return run(
        "desiccant.by_effectiveness",
        Sorbed,
        ("entering", entering),
        ("effectiveness", effectiveness),
        ("driest", driest),
        *_sorption(sorption_heat_ratio, carried, carry_over),
    )


@overload
def wheel(
    entering: AirStream[float],
    *,
    target: float,
    sorption_heat_ratio: float,
    regeneration: AirStream[float],
    value: float,
    heater: Heater = ...,
    carried: float = ...,
    carry_over: CarryOver = ...,
) -> Wheel[float]: ...
@overload
def wheel(
    entering: AirStream[Any],
    *,
    target: ArrayLike,
    sorption_heat_ratio: ArrayLike,
    regeneration: AirStream[Any],
    value: ArrayLike,
    heater: Heater = ...,
    carried: ArrayLike = ...,
    carry_over: CarryOver = ...,
) -> Wheel[Array]: ...
def wheel(
    entering: AirStream[Any],
    *,
    target: ArrayLike,
    sorption_heat_ratio: ArrayLike,
    regeneration: AirStream[Any],
    value: ArrayLike,
    heater: Heater = "entering_temperature",
    carried: ArrayLike = 0.0,
    carry_over: CarryOver = "none",
) -> Wheel[Any]:
    """A wheel that dries air to a humidity ratio, both sides by balances, with the heater of its regeneration.

    Whether a wheel of this size and speed gets so dry is not asked here: `wheel_by_potentials` answers that for silica gel.
    That it would be against the second law is reported.

    Parameters
    ----------
    entering : AirStream
        The air that is dried.
    target : float or array_like
        Humidity ratio to be reached, kg/kg.
    sorption_heat_ratio : float or array_like
        Heat of sorption over heat of vaporization, 0.5 to 3.
    regeneration : AirStream
        The air that enters the heater.
    value : float or array_like
        What is known of the heater: its heat, W, or a temperature, °C.
    heater : {'heat', 'entering_temperature', 'leaving_temperature'}
        What `value` is: the temperatures are those of the air between heater and wheel, and behind the wheel.
    carried : float or array_like
        What the matrix carries over, W for `heat`, K for `rise`.
    carry_over : {'none', 'heat', 'rise'}
        What `carried` is.

    Returns
    -------
    Wheel

    Raises
    ------
    InfeasibleError
        The heater would have to cool, the regeneration air cannot take the water up, or as `to_humidity_ratio`.
    ProcessError
        States of different formulations, or no flow.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, desiccant
    >>> stream = lambda t, w, m: AirStream(MoistAir(dry_bulb=t, humidity_ratio=w, pressure=101_325.0), dry_air_flow=m)
    >>> done = desiccant.wheel(
    ...     stream(25.0, 0.012, 1.0), target=0.006, sorption_heat_ratio=1.1, regeneration=stream(30.0, 0.014, 0.4), value=120.0
    ... )
    >>> done.wheel.name, round(done.regeneration_heat / 1e3)
    ('POSSIBLE', 37)
    """
    expect(entering, AirStream, "entering")
    expect(regeneration, AirStream, "regeneration")
    return run(
        "desiccant.wheel",
        Wheel,
        ("entering", entering),
        ("target", target),
        *_sorption(sorption_heat_ratio, carried, carry_over),
        ("regeneration", regeneration),
        ("heater", code(_HEATER, heater, "heater")[1]),
        ("heater.value", value),
    )


@overload
def potentials(air: MoistAir[float]) -> Potentials[float]: ...
@overload
def potentials(air: MoistAir[Any]) -> Potentials[Array]: ...
def potentials(air: MoistAir[Any]) -> Potentials[Any]:
    """The potentials F₁ and F₂ of air over silica gel.

    F₁ = −2865/T^1.490 + 4.344 w^0.8624 and F₂ = T^1.490/6360 − 1.127 w^0.07969 (Maclaine-cross and Banks 1972; Jurinak 1982;
    the constants from memory).

    Parameters
    ----------
    air : MoistAir
        State of the air, 275 to 425 K.

    Returns
    -------
    Potentials

    Raises
    ------
    InfeasibleError
        Air without vapor.
    OutOfRangeError
        Outside 275 to 425 K.
    """
    expect(air, MoistAir, "air")
    return run("desiccant.potentials", Potentials, ("air", air))


@overload
def wheel_by_potentials(
    entering: AirStream[float],
    *,
    regeneration: AirStream[float],
    first_effectiveness: float,
    second_effectiveness: float,
) -> PotentialWheel[float]: ...
@overload
def wheel_by_potentials(
    entering: AirStream[Any],
    *,
    regeneration: AirStream[Any],
    first_effectiveness: ArrayLike,
    second_effectiveness: ArrayLike,
) -> PotentialWheel[Array]: ...
def wheel_by_potentials(
    entering: AirStream[Any],
    *,
    regeneration: AirStream[Any],
    first_effectiveness: ArrayLike,
    second_effectiveness: ArrayLike,
) -> PotentialWheel[Any]:
    """A wheel of silica gel between process air and hot regeneration air, by its potentials.

    The process side is by the potentials, the regeneration side by the balances, so that the books close; what the
    potentials leave over is reported. Expect 10 % of the drying, at best; not for other desiccants or unlike flows.

    Parameters
    ----------
    entering : AirStream
        The air that is dried.
    regeneration : AirStream
        The hot air; a heater before it is `sensible`.
    first_effectiveness, second_effectiveness : float or array_like
        In each potential, 0 to 1: 0.05 to 0.10 and 0.90 to 0.95 for good wheels (from memory of the literature).

    Returns
    -------
    PotentialWheel

    Raises
    ------
    InfeasibleError
        A stream without vapor, fog behind the wheel, or a result outside 275 to 425 K.
    ProcessError
        States of different formulations, or no flow.
    NotFiniteError, OutOfRangeError
        An input, or air outside 275 to 425 K.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, desiccant
    >>> stream = lambda t: AirStream(MoistAir(dry_bulb=t, humidity_ratio=0.014, pressure=101_325.0), dry_air_flow=1.0)
    >>> done = desiccant.wheel_by_potentials(
    ...     stream(30.0), regeneration=stream(85.0), first_effectiveness=0.07, second_effectiveness=0.92
    ... )
    >>> round(done.process.air.dry_bulb, 1), round(done.process.air.humidity_ratio, 4)
    (62.4, 0.0041)
    """
    expect(entering, AirStream, "entering")
    expect(regeneration, AirStream, "regeneration")
    return run(
        "desiccant.wheel_by_potentials",
        PotentialWheel,
        ("entering", entering),
        ("regeneration", regeneration),
        ("first_effectiveness", first_effectiveness),
        ("second_effectiveness", second_effectiveness),
    )


@overload
def effectiveness_between(
    air: MoistAir[float], *, dried: MoistAir[float], regeneration: MoistAir[float]
) -> Effectiveness[float]: ...
@overload
def effectiveness_between(
    air: MoistAir[Any], *, dried: MoistAir[Any], regeneration: MoistAir[Any]
) -> Effectiveness[Array]: ...
def effectiveness_between(
    air: MoistAir[Any], *, dried: MoistAir[Any], regeneration: MoistAir[Any]
) -> Effectiveness[Any]:
    """The effectiveness of a wheel in each potential, from a test.

    The first is a small difference of two nearly equal numbers: states known to 0.3 K and 0.2 g/kg make it no better than
    ±0.02.

    Parameters
    ----------
    air : MoistAir
        Process air before the wheel.
    dried : MoistAir
        Process air behind it.
    regeneration : MoistAir
        Regeneration air before the wheel.

    Returns
    -------
    Effectiveness

    Raises
    ------
    InfeasibleError
        A result outside 0 to 1, or air without vapor.
    OutOfRangeError
        Air outside 275 to 425 K.
    """
    expect(air, MoistAir, "air")
    expect(dried, MoistAir, "dried")
    expect(regeneration, MoistAir, "regeneration")
    return run(
        "desiccant.effectiveness_between", Effectiveness, ("air", air), ("dried", dried), ("regeneration", regeneration)
    )
