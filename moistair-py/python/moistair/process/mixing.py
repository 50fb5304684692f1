"""Adiabatic mixing of any number of streams, with fog and ice where they form."""

from __future__ import annotations

import enum
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._core import MoistAir
from .._formulation import Formulation, formulation_code
from .._rows import Array, Record, T, expect, run
from ..signal import Quality
from ._streams import AirStream, Exchange, Freezing, WetStream, code, freezing_code, wet_all
from .measured import MeasuredAir, Reading, air_parts, quantity_code, reading_parts

__all__ = [
    "Blend",
    "FractionStatus",
    "Mixed",
    "OutdoorAirFraction",
    "Reach",
    "adiabatic",
    "adiabatic_at",
    "outdoor_air_for_temperature",
    "outdoor_air_from_air",
    "outdoor_air_from_flows",
    "outdoor_air_from_readings",
    "remainder",
    "with_outdoor_air",
]

#: What the flow beside that of the outdoor air is: all the air, or what outdoor air mixes with.
OtherFlow = Union[Literal["total"], Literal["recirculated"]]

_OTHER = {"total": 0, "recirculated": 1}


class FractionStatus(enum.IntEnum):
    """What a measured outdoor-air fraction is worth."""

    DETERMINED = 0
    """As certain as was asked."""
    UNCERTAIN = 1
    """Less certain than was asked, or from a difference within twice its own uncertainty."""
    BELOW_ZERO = 2
    """Below zero by more than twice its uncertainty: a sensor fault."""
    ABOVE_ONE = 3
    """Above one by more than twice its uncertainty: a sensor fault."""
    INDETERMINATE = 4
    """Outdoor and return air read the same, or no air flows: any fraction would do."""


class Reach(enum.IntEnum):
    """Whether an outdoor-air fraction gives the wanted temperature."""

    REACHED = 0
    """The mixture has it."""
    AT_LEAST = 1
    """At the least outdoor air: the nearest that the dampers allow, or held there by an economizer that is off."""
    AT_MOST = 2
    """At the most outdoor air: the nearest that the dampers allow, or all of it where an economizer wants air colder than either."""


@dataclass(frozen=True, eq=False, init=False)
class OutdoorAirFraction(Record, Generic[T]):
    """A measured outdoor-air fraction.

    Attributes
    ----------
    fraction : float or numpy.ndarray
        Raw, not clamped to 0 … 1; NaN when indeterminate.
    standard_uncertainty : float or numpy.ndarray
        Of the fraction; NaN when indeterminate.
    fraction_status : FractionStatus or numpy.ndarray
        What it is worth.
    quality : Quality or numpy.ndarray
        The worst of the readings.
    """

    fraction: T
    standard_uncertainty: T
    fraction_status: Union[FractionStatus, NDArray[np.int32]]
    quality: Union[Quality, NDArray[np.int32]]


@dataclass(frozen=True, eq=False, init=False)
class Mixed(Record, Generic[T]):
    """What mixing gave.

    Attributes
    ----------
    leaving : WetStream
        The mixture, with its fog or ice if any.
    exchange : Exchange
        Nothing: mixing is adiabatic.
    """

    leaving: WetStream[T]
    exchange: Exchange[T]


@overload
def adiabatic(*streams: Union[AirStream[float], WetStream[float]]) -> Mixed[float]: ...
@overload
def adiabatic(*streams: Union[AirStream[Any], WetStream[Any]]) -> Mixed[Array]: ...
def adiabatic(*streams: Union[AirStream[Any], WetStream[Any]]) -> Mixed[Any]:
    """Mixes streams at one pressure: W₃ = Σ ṁ W / Σ ṁ and h₃ = Σ ṁ h / Σ ṁ with all condensate, then phase equilibrium.

    A stream without flow takes no part. A single stream leaves as it came.

    Parameters
    ----------
    *streams : AirStream or WetStream
        The streams that enter, at most 32.

    Returns
    -------
    Mixed

    Raises
    ------
    ProcessError
        Nothing flows, different formulations, or different pressures (use `adiabatic_at`).
    InfeasibleError
        The mixture would leave the range of states.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, mixing
    >>> room = MoistAir(dry_bulb=30.0, relative_humidity=0.9, pressure=101_325.0)
    >>> outdoor = MoistAir(dry_bulb=-10.0, relative_humidity=0.8, pressure=101_325.0)
    >>> mixed = mixing.adiabatic(AirStream(room, dry_air_flow=1.0), AirStream(outdoor, dry_air_flow=1.0))
    >>> mixed.leaving.air.is_wet  # fog
    True
    """
    return run("mixing.adiabatic", Mixed, *wet_all(streams, "streams"))


@overload
def adiabatic_at(
    *streams: Union[AirStream[float], WetStream[float]], pressure: float, freezing: Freezing = ...
) -> Mixed[float]: ...
@overload
def adiabatic_at(
    *streams: Union[AirStream[Any], WetStream[Any]], pressure: ArrayLike, freezing: Freezing = ...
) -> Mixed[Array]: ...
def adiabatic_at(
    *streams: Union[AirStream[Any], WetStream[Any]], pressure: ArrayLike, freezing: Freezing = "equilibrium"
) -> Mixed[Any]:
    """The same at a stated outlet pressure, and with a choice whether fog freezes.

    Parameters
    ----------
    *streams : AirStream or WetStream
        The streams that enter, at most 32.
    pressure : float or array_like
        Of the outlet, Pa.
    freezing : {'equilibrium', 'supercooled'}
        Whether condensate below the melting temperature is ice, or liquid as in fog down to about −15 °C.

    Returns
    -------
    Mixed

    Raises
    ------
    ProcessError
        Nothing flows, or different formulations.
    InfeasibleError
        The mixture would leave the range of states.
    NotFiniteError, OutOfRangeError
        The pressure.
    """
    outlet = ("pressure", pressure)
    return run("mixing.adiabatic_at", Mixed, outlet, freezing_code(freezing), *wet_all(streams, "streams"))


@overload
def remainder(*, total_flow: float, part: AirStream[float], air: MoistAir[float]) -> AirStream[float]: ...
@overload
def remainder(*, total_flow: ArrayLike, part: AirStream[Any], air: MoistAir[Any]) -> AirStream[Array]: ...
def remainder(*, total_flow: ArrayLike, part: AirStream[Any], air: MoistAir[Any]) -> AirStream[Any]:
    """The stream that is left of a total dry-air flow when a part of it is known.

    The recirculated air, where the flows of outdoor and supply air are measured.

    Parameters
    ----------
    total_flow : float or array_like
        Total dry-air mass flow, kg/s.
    part : AirStream
        The part that is known.
    air : MoistAir
        State of the rest.

    Returns
    -------
    AirStream

    Raises
    ------
    InfeasibleError
        The part is more than the total.
    NotFiniteError, OutOfRangeError
        The total.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, mixing
    >>> outdoor = MoistAir(dry_bulb=32.0, relative_humidity=0.45, pressure=101_325.0)
    >>> room = MoistAir(dry_bulb=24.0, relative_humidity=0.5, pressure=101_325.0)
    >>> mixing.remainder(total_flow=6.0, part=AirStream(outdoor, dry_air_flow=1.5), air=room).dry_air_flow
    4.5
    """
    expect(part, AirStream, "part")
    expect(air, MoistAir, "air")
    return run("mixing.remainder", AirStream, ("total_flow", total_flow), ("part", part), ("air", air))


@dataclass(frozen=True, eq=False, init=False)
class Blend(Record, Generic[T]):
    """An outdoor-air fraction and what it mixes.

    Attributes
    ----------
    fraction : float or numpy.ndarray
        Outdoor-air fraction of the dry air, within the limits.
    mixed : Mixed
        The mixture, of 1 kg/s of dry air.
    reach : Reach or numpy.ndarray
        Whether it has the wanted temperature.
    """

    fraction: T
    mixed: Mixed[T]
    reach: Union[Reach, NDArray[np.int32]]


def outdoor_air_from_readings(
    *, quantity: str, outdoor: Reading, returned: Reading, mixed: Reading, acceptable: ArrayLike = 0.05
) -> OutdoorAirFraction[Any]:
    """The outdoor-air fraction x = (m − r) / (o − r) from readings of one quantity, with its standard uncertainty.

    Exact by enthalpy, humidity ratio and tracer; by dry bulbs off by up to 0.005 for airs that differ by 10 g/kg, and wrong in fog.
    Differences of less than 3 to 5 K say little (common practice, no source). Stratification in a mixing box can exceed all of
    this.

    Parameters
    ----------
    quantity : {'dry_bulb', 'humidity_ratio', 'specific_enthalpy', 'tracer_concentration'}
        What is read.
    outdoor, returned, mixed : Reading
        The readings, or columns of them.
    acceptable : float or array_like
        Standard uncertainty of the fraction up to which it counts as determined.

    Returns
    -------
    OutdoorAirFraction

    Raises
    ------
    ValueError
        Another quantity.
    NotFiniteError, OutOfRangeError
        A missing or refused reading.

    Examples
    --------
    >>> from moistair.process import mixing
    >>> from moistair.process.measured import Reading
    >>> outdoor, room, mixed = (Reading(t, standard_uncertainty=0.2) for t in (4.0, 24.0, 19.0))
    >>> found = mixing.outdoor_air_from_readings(quantity="dry_bulb", outdoor=outdoor, returned=room, mixed=mixed)
    >>> found.fraction, round(found.standard_uncertainty, 4), found.fraction_status.name
    (0.25, 0.0127, 'DETERMINED')
    """
    if quantity not in ("dry_bulb", "humidity_ratio", "specific_enthalpy", "tracer_concentration"):
        raise ValueError(f"quantity must be a dry bulb, humidity ratio, specific enthalpy or tracer, not {quantity!r}")
    readings = (("outdoor", outdoor), ("returned", returned), ("mixed", mixed))
    parts = [part for label, reading in readings for part in reading_parts(label, reading)]
    chosen = ("quantity", quantity_code(quantity))
    return run("mixing.outdoor_air_from_readings", OutdoorAirFraction, chosen, *parts, ("acceptable", acceptable))


def outdoor_air_from_air(
    *,
    quantity: str,
    outdoor: MeasuredAir,
    returned: MeasuredAir,
    mixed: MeasuredAir,
    pressure: ArrayLike,
    acceptable: ArrayLike = 0.05,
    formulation: Formulation = "real_gas",
) -> OutdoorAirFraction[Any]:
    """The same from measured states, by enthalpy or humidity ratio, with the uncertainty that temperature and humidity sensors leave in it.

    Parameters
    ----------
    quantity : {'humidity_ratio', 'specific_enthalpy'}
        By what.
    outdoor, returned, mixed : MeasuredAir
        The readings of air without condensate, or columns of them.
    pressure : float or array_like
        Pa.
    acceptable : float or array_like
        Standard uncertainty of the fraction up to which it counts as determined.
    formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
        Formulation.

    Returns
    -------
    OutdoorAirFraction

    Raises
    ------
    ValueError
        Another quantity.
    NotFiniteError, OutOfRangeError, StateError
        Readings that make no state.
    """
    if quantity not in ("humidity_ratio", "specific_enthalpy"):
        raise ValueError(f"quantity must be a humidity ratio or specific enthalpy, not {quantity!r}")
    airs = (("outdoor", outdoor), ("returned", returned), ("mixed", mixed))
    parts = [part for label, air in airs for part in air_parts(label, air)]
    return run(
        "mixing.outdoor_air_from_air",
        OutdoorAirFraction,
        formulation_code(formulation),
        ("quantity", quantity_code(quantity)),
        *parts,
        ("pressure", pressure),
        ("acceptable", acceptable),
    )


def outdoor_air_from_flows(
    *, outdoor: Reading, other: Reading, other_is: OtherFlow = "total", acceptable: ArrayLike = 0.05
) -> OutdoorAirFraction[Any]:
    """The outdoor-air fraction from measured dry-air flows.

    Parameters
    ----------
    outdoor, other : Reading
        kg/s.
    other_is : {'total', 'recirculated'}
        Whether the other flow is that of all the air, or what outdoor air mixes with.
    acceptable : float or array_like
        Standard uncertainty of the fraction up to which it counts as determined.

    Returns
    -------
    OutdoorAirFraction

    Raises
    ------
    NotFiniteError, OutOfRangeError
        A flow.
    """
    parts = reading_parts("outdoor", outdoor) + reading_parts("other", other)
    chosen = code(_OTHER, other_is, "other_is")
    return run("mixing.outdoor_air_from_flows", OutdoorAirFraction, *parts, chosen, ("acceptable", acceptable))


@overload
def outdoor_air_for_temperature(
    *, outdoor: MoistAir[float], returned: MoistAir[float], wanted_temperature: float, least: float = ..., most: float = ...
) -> Blend[float]: ...
@overload
def outdoor_air_for_temperature(
    *,
    outdoor: MoistAir[Any],
    returned: MoistAir[Any],
    wanted_temperature: ArrayLike,
    least: ArrayLike = ...,
    most: ArrayLike = ...,
) -> Blend[Array]: ...
def outdoor_air_for_temperature(
    *,
    outdoor: MoistAir[Any],
    returned: MoistAir[Any],
    wanted_temperature: ArrayLike,
    least: ArrayLike = 0.0,
    most: ArrayLike = 1.0,
) -> Blend[Any]:
    """The outdoor-air fraction that mixes to a wanted temperature, or comes nearest to it within the limits, with moisture and fog.

    Parameters
    ----------
    outdoor, returned : MoistAir
        The states.
    wanted_temperature : float or array_like
        Mixed dry bulb, °C.
    least, most : float or array_like
        Limits of the outdoor-air fraction.

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

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import mixing
    >>> cold = MoistAir(dry_bulb=5.0, relative_humidity=0.7, pressure=101_325.0)
    >>> room = MoistAir(dry_bulb=24.0, relative_humidity=0.45, pressure=101_325.0)
    >>> blend = mixing.outdoor_air_for_temperature(outdoor=cold, returned=room, wanted_temperature=14.0)
    >>> round(blend.fraction, 2), blend.reach.name
    (0.53, 'REACHED')
    """
    expect(outdoor, MoistAir, "outdoor")
    expect(returned, MoistAir, "returned")
    return run(
        "mixing.outdoor_air_for_temperature",
        Blend,
        ("outdoor", outdoor),
        ("returned", returned),
        ("wanted_temperature", wanted_temperature),
        ("least", least),
        ("most", most),
    )


@overload
def with_outdoor_air(*, outdoor: MoistAir[float], returned: MoistAir[float], fraction: float) -> Mixed[float]: ...
@overload
def with_outdoor_air(*, outdoor: MoistAir[Any], returned: MoistAir[Any], fraction: ArrayLike) -> Mixed[Array]: ...
def with_outdoor_air(*, outdoor: MoistAir[Any], returned: MoistAir[Any], fraction: ArrayLike) -> Mixed[Any]:
    """Mixes so much outdoor air with return air: 1 kg/s of dry air of the mixture.

    Parameters
    ----------
    outdoor, returned : MoistAir
        The states.
    fraction : float or array_like
        Outdoor-air fraction of the dry air.

    Returns
    -------
    Mixed

    Raises
    ------
    ProcessError
        Different formulations or pressures.
    NotFiniteError, OutOfRangeError
        The fraction.
    """
    expect(outdoor, MoistAir, "outdoor")
    expect(returned, MoistAir, "returned")
    return run(
        "mixing.with_outdoor_air", Mixed, ("outdoor", outdoor), ("returned", returned), ("fraction", fraction)
    )
