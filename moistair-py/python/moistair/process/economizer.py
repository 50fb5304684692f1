"""Air-side economizer: whether outdoor air saves cooling, how sure that is, and how much of it to take.

A decision always comes. Whatever is wrong with a reading, a setting or the clock, it is the safe one, least outdoor air; with the
fallback `"dry_bulb"`, where only a humidity is missing, that of the dry bulbs alone.

The rules are the high limits of ASHRAE Standard 90.1 (its values here are from memory), and the one that they stand in for: which
air the coil has less work with. With the errors of real humidity sensors a switch by enthalpy may do worse than one by dry bulb
(Taylor and Cheng 2010, ASHRAE Journal 52(11)): look at the confidence. Left out are fans, leaking dampers, stratification.

The freeze lockout is no protection: coils freeze and burst within minutes, and only a hard-wired freezestat protects them. The
least outdoor air is set by ventilation codes, which govern.
"""

from __future__ import annotations

import enum
import math
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .. import _core
from .._core import EconomizerState, MoistAir
from .._formulation import Formulation, formulation_code
from .._rows import Array, Record, T, _plan, expect, run
from ..signal import Quality
from ._streams import code
from .measured import MeasuredAir, Reading, air_parts
from .mixing import Blend

__all__ = [
    "CoilLoad",
    "Decision",
    "Economizer",
    "EconomizerReason",
    "EconomizerRule",
    "EconomizerState",
    "MarginQuantity",
    "coil_load",
    "enthalpy_limit",
]

#: What to do when a humidity is missing and the temperatures are not.
Fallback = Union[Literal["least_outdoor_air"], Literal["dry_bulb"]]

_FALLBACK = {"least_outdoor_air": 0, "dry_bulb": 1}


class EconomizerRule(enum.IntEnum):
    """What outdoor air must not exceed. Several conditions must all hold."""

    FIXED_DRY_BULB = 0
    """Outdoor dry bulb: the limit."""
    DIFFERENTIAL_DRY_BULB = 1
    """Outdoor dry bulb: that of the return air."""
    FIXED_ENTHALPY = 2
    """Outdoor enthalpy: the limit."""
    DIFFERENTIAL_ENTHALPY = 3
    """Outdoor enthalpy: that of the return air."""
    FIXED_ENTHALPY_AND_DRY_BULB = 4
    """Outdoor enthalpy and dry bulb: the limits."""
    DIFFERENTIAL_ENTHALPY_AND_DRY_BULB = 5
    """Outdoor enthalpy: that of the return air; dry bulb: the limit."""
    DEW_POINT_AND_DRY_BULB = 6
    """Outdoor dew point and dry bulb: the limits."""
    LEAST_COIL_ENERGY = 7
    """What the coil would take out of outdoor air: what it would out of return air."""


class EconomizerReason(enum.IntEnum):
    """Why it was decided so."""

    FAVORABLE = 0
    """On: outdoor air is favorable."""
    LEAST_TIME_ON = 1
    """On: no longer favorable, but on for less than the least time."""
    DRY_BULB_HIGH = 2
    """Off: the outdoor dry bulb is too high."""
    ENTHALPY_HIGH = 3
    """Off: the outdoor enthalpy is too high."""
    DEW_POINT_HIGH = 4
    """Off: the outdoor dew point is too high."""
    COIL_ENERGY_HIGH = 5
    """Off: outdoor air would cost the coil as much or more."""
    WITHIN_HYSTERESIS = 6
    """Off: favorable, but not yet by the hysteresis."""
    LEAST_TIME_OFF = 7
    """Off: favorable, but off for less than the least time."""
    FREEZE_LOCKOUT = 8
    """Off: outdoor air so cold that the dampers stay at their least."""
    OUTDOOR_DRY_BULB_BAD = 9
    """Off: no usable outdoor dry bulb."""
    OUTDOOR_HUMIDITY_BAD = 10
    """Off: no usable outdoor humidity, or none at this dry bulb."""
    RETURN_DRY_BULB_BAD = 11
    """Off: no usable return dry bulb."""
    RETURN_HUMIDITY_BAD = 12
    """Off: no usable return humidity, or none at this dry bulb."""
    SETTINGS_INVALID = 13
    """Off: the settings make no sense; `Economizer.check` says which."""
    CLOCK_INVALID = 14
    """Off: the time is no number or beyond 1e11 s."""


class MarginQuantity(enum.IntEnum):
    """What a margin is a difference of; the codes are those of the quantities."""

    DRY_BULB = 0
    """K."""
    SPECIFIC_ENTHALPY = 7
    """J/kg."""
    DEW_POINT = 21
    """K."""
    COIL_ENERGY = 155
    """J/kg."""


@dataclass(frozen=True, eq=False, init=False)
class Decision(Record, Generic[T]):
    """What was decided, at one time or at many.

    Attributes
    ----------
    enabled : bool or numpy.ndarray
        Whether outdoor air beyond the least may be taken.
    reason : EconomizerReason or numpy.ndarray
        Why.
    margin : float or numpy.ndarray
        How far the outdoor air is below what it must not exceed: positive speaks for outdoor air. Of several conditions, that of
        the one nearest to failing; under freeze lockout, how far it is above the freeze limit; 0 where nothing could be compared.
        Always finite.
    margin_uncertainty : float or numpy.ndarray
        Standard uncertainty of the margin by that of the readings.
    margin_quantity : MarginQuantity or numpy.ndarray
        What the margin is a difference of.
    confidence : float or numpy.ndarray
        Probability that the air truly lies on the side that was decided for; of several conditions, the least that it can be; 0.5
        is a coin toss, 0 where nothing could be compared.
    quality : Quality or numpy.ndarray
        The worst of the readings that were used; refused where there was none.
    fallback : bool or numpy.ndarray
        Whether the dry bulbs alone decided, for want of a humidity.
    """

    enabled: Union[bool, NDArray[np.bool_]]
    reason: Union[EconomizerReason, NDArray[np.int32]]
    margin: T
    margin_uncertainty: T
    margin_quantity: Union[MarginQuantity, NDArray[np.int32]]
    confidence: T
    quality: Union[Quality, NDArray[np.int32]]
    fallback: Union[bool, NDArray[np.bool_]]

    @overload
    def outdoor_air(
        self: Decision[float],
        *,
        outdoor: MoistAir[float],
        returned: MoistAir[float],
        wanted_temperature: float,
        least: float,
        most: float = 1.0,
    ) -> Blend[float]: ...
    @overload
    def outdoor_air(
        self: Decision[Any],
        *,
        outdoor: MoistAir[Any],
        returned: MoistAir[Any],
        wanted_temperature: ArrayLike,
        least: ArrayLike,
        most: ArrayLike = 1.0,
    ) -> Blend[Array]: ...
    def outdoor_air(
        self,
        *,
        outdoor: MoistAir[Any],
        returned: MoistAir[Any],
        wanted_temperature: ArrayLike,
        least: ArrayLike,
        most: ArrayLike = 1.0,
    ) -> Blend[Any]:
        """How much outdoor air to take: the least when off; when on, what mixes to the wanted temperature.

        Where that is colder than both airs, outdoor air as far as the dampers go, and the coil does the rest; where it is warmer
        than both, the nearest.

        Parameters
        ----------
        outdoor, returned : MoistAir
            The states.
        wanted_temperature : float or array_like
            Mixed dry bulb, °C.
        least, most : float or array_like
            Limits of the outdoor-air fraction; the least by ventilation codes.

        Returns
        -------
        Blend

        Raises
        ------
        ProcessError
            Different formulations or pressures.
        InfeasibleError
            Limits the wrong way round.
        NotFiniteError, OutOfRangeError
            The temperature or a limit.
        """
        expect(outdoor, MoistAir, "outdoor")
        expect(returned, MoistAir, "returned")
        enabled = float(self.enabled) if isinstance(self.enabled, bool) else np.asarray(self.enabled, dtype=np.float64)
        return run(
            "economizer.outdoor_air",
            Blend,
            ("enabled", enabled),
            ("outdoor", outdoor),
            ("returned", returned),
            ("wanted_temperature", wanted_temperature),
            ("least", least),
            ("most", most),
        )


@dataclass(frozen=True, eq=False, init=False)
class CoilLoad(Record, Generic[T]):
    """What a coil takes out of air.

    Attributes
    ----------
    heat : float or numpy.ndarray
        Heat per mass of dry air, 0 or more, J/kg.
    wet : bool or numpy.ndarray
        Whether water condenses.
    """

    heat: T
    wet: Union[bool, NDArray[np.bool_]]


_USUAL = _core.economizer_default(101_325.0)


@dataclass(frozen=True)
class Economizer:
    """The settings of an economizer.

    Settings that make no sense are no error here: `check` raises what is wrong with them, and `decide` then says least outdoor air.

    Parameters
    ----------
    rule : EconomizerRule
        The rule.
    pressure : float
        Of the site, Pa.
    dry_bulb_limit : float
        Fixed limit of the outdoor dry bulb, °C; 75 °F.
    enthalpy_limit : float
        Fixed limit of the outdoor enthalpy, J/kg; 28 Btu/lb near sea level, elsewhere `enthalpy_limit` of this module.
    dew_point_limit : float
        Fixed limit of the outdoor dew point, °C; 55 °F.
    supply_temperature : float
        What the coil is to supply, for LEAST_COIL_ENERGY, °C.
    coil_leaving_humidity : float
        Relative humidity at which a wet coil leaves the air.
    temperature_hysteresis : float
        By how much a dry bulb or dew point must be below its limit before it switches on, K; it switches off at the limit.
    enthalpy_hysteresis : float
        The same of an enthalpy or a coil energy, J/kg.
    least_time_on, least_time_off : float
        s. A bad reading and the freeze lockout do not wait for them.
    freeze_limit : float
        Below this outdoor dry bulb the dampers stay at their least, °C.
    fallback : {'least_outdoor_air', 'dry_bulb'}
        What to do when a humidity is missing.
    formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
        Formulation.

    Examples
    --------
    >>> from moistair.process.economizer import Economizer, EconomizerRule, EconomizerState
    >>> from moistair.process.measured import MeasuredAir, within
    >>> economizer = Economizer(rule=EconomizerRule.DIFFERENTIAL_ENTHALPY, pressure=101_325.0)
    >>> state = EconomizerState()
    >>> room = MeasuredAir(dry_bulb=within(24.0, 0.5), relative_humidity=within(0.50, 0.03))
    >>> outdoor = MeasuredAir(dry_bulb=within(16.0, 0.5), relative_humidity=within(0.70, 0.03))
    >>> decision = economizer.decide(state, time=0.0, outdoor=outdoor, returned=room)
    >>> decision.enabled, decision.reason.name, round(decision.confidence, 3)
    (True, 'FAVORABLE', 1.0)
    >>> nan = MeasuredAir(dry_bulb=within([16.0, 16.0], 0.5), relative_humidity=within([0.7, float("nan")], 0.03))
    >>> economizer.decide(state, time=[60.0, 120.0], outdoor=nan, returned=room).enabled
    array([ True, False])
    """

    rule: EconomizerRule
    pressure: float
    dry_bulb_limit: float = _USUAL[1]
    enthalpy_limit: float = _USUAL[2]
    dew_point_limit: float = _USUAL[3]
    supply_temperature: float = _USUAL[4]
    coil_leaving_humidity: float = _USUAL[5]
    temperature_hysteresis: float = _USUAL[6]
    enthalpy_hysteresis: float = _USUAL[7]
    least_time_on: float = _USUAL[8]
    least_time_off: float = _USUAL[9]
    freeze_limit: float = _USUAL[10]
    fallback: Fallback = "least_outdoor_air"
    formulation: Formulation = "real_gas"

    def _settings(self) -> tuple[tuple[float, ...], tuple[int, int, int]]:
        numbers = (
            self.pressure,
            self.dry_bulb_limit,
            self.enthalpy_limit,
            self.dew_point_limit,
            self.supply_temperature,
            self.coil_leaving_humidity,
            self.temperature_hysteresis,
            self.enthalpy_hysteresis,
            self.least_time_on,
            self.least_time_off,
            self.freeze_limit,
        )
        fallback = code(_FALLBACK, self.fallback, "fallback")[1]
        return numbers, (int(EconomizerRule(self.rule)), fallback, formulation_code(self.formulation)[1])

    def check(self) -> None:
        """Raises what is wrong with the settings, if anything.

        Raises
        ------
        NotFiniteError, OutOfRangeError, StateError
            The setting that makes no sense.
        """
        _core.economizer_check(*self._settings())

    @overload
    def decide(
        self, state: EconomizerState, *, time: float, outdoor: MeasuredAir, returned: Union[MeasuredAir, None] = None
    ) -> Decision[float]: ...
    @overload
    def decide(
        self, state: EconomizerState, *, time: ArrayLike, outdoor: MeasuredAir, returned: Union[MeasuredAir, None] = None
    ) -> Decision[Any]: ...
    def decide(
        self, state: EconomizerState, *, time: ArrayLike, outdoor: MeasuredAir, returned: Union[MeasuredAir, None] = None
    ) -> Decision[Any]:
        """Decides at one time, or at the times of a column one after the other, and notes it in the state.

        Only what the rule needs is read: a fixed limit no return air, a rule of dry bulbs no humidity.

        Parameters
        ----------
        state : EconomizerState
            What the economizer remembers; changed.
        time : float or array_like
            s since any fixed instant.
        outdoor, returned : MeasuredAir
            The readings, one or a column of each.

        Returns
        -------
        Decision
        """
        nothing = Reading(math.nan, standard_uncertainty=0.0, quality=2)
        airs = [outdoor, MeasuredAir(dry_bulb=nothing) if returned is None else returned]
        parts = [air_parts(label, air) for label, air in zip(("outdoor", "returned"), airs)]
        values = [time] + [value for air in parts for _, value in air[:-1]]
        quantities = (parts[0][-1][1], parts[1][-1][1])
        results = _core.economizer_decide(*self._settings(), quantities, state, values)
        decision: Decision[Any] = _plan(Decision)[1](iter(results), 0)
        return decision


@overload
def coil_load(air: MoistAir[float], *, supply_temperature: float, coil_leaving_humidity: float = ...) -> CoilLoad[float]: ...
@overload
def coil_load(
    air: MoistAir[Any], *, supply_temperature: ArrayLike, coil_leaving_humidity: ArrayLike = ...
) -> CoilLoad[Array]: ...
def coil_load(
    air: MoistAir[Any], *, supply_temperature: ArrayLike, coil_leaving_humidity: ArrayLike = 0.95
) -> CoilLoad[Any]:
    """Heat that a coil has to take out of air to supply it: the larger of that of a dry and that of a wet coil, 0 where none is needed.

    Parameters
    ----------
    air : MoistAir
        What enters.
    supply_temperature : float or array_like
        Dry bulb behind the coil, °C.
    coil_leaving_humidity : float or array_like
        Relative humidity at which a wet coil leaves the air.

    Returns
    -------
    CoilLoad

    Raises
    ------
    NotFiniteError, OutOfRangeError, StateError
        The supply.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process.economizer import coil_load
    >>> room = MoistAir(dry_bulb=24.0, relative_humidity=0.5, pressure=101_325.0)
    >>> coil_load(room, supply_temperature=12.0).wet, coil_load(room, supply_temperature=18.0).wet
    (True, False)
    """
    expect(air, MoistAir, "air")
    return run(
        "economizer.coil_load",
        CoilLoad,
        ("air", air),
        ("supply_temperature", supply_temperature),
        ("coil_leaving_humidity", coil_leaving_humidity),
    )


@overload
def enthalpy_limit(*, pressure: float, formulation: Formulation = ...) -> float: ...
@overload
def enthalpy_limit(*, pressure: ArrayLike, formulation: Formulation = ...) -> Union[float, Array]: ...
def enthalpy_limit(*, pressure: ArrayLike, formulation: Formulation = "real_gas") -> Union[float, Array]:
    """The fixed enthalpy limit at a pressure: that of air of 75 °F and 50 %, as ASHRAE 90.1 has it away from sea level (from memory).

    Parameters
    ----------
    pressure : float or array_like
        Of the site, Pa.
    formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
        Formulation.

    Returns
    -------
    float or numpy.ndarray
        J/kg.

    Raises
    ------
    NotFiniteError, OutOfRangeError
        The pressure.

    Examples
    --------
    >>> from moistair.process.economizer import enthalpy_limit
    >>> round(enthalpy_limit(pressure=101_325.0, formulation="ideal_gas") / 1e3, 1)
    47.5
    """
    return run(
        "economizer.enthalpy_limit",
        float,
        formulation_code(formulation),
        ("pressure", pressure),
    )
