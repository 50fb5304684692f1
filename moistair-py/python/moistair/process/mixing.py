"""Adiabatic mixing of any number of streams, with fog and ice where they form."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Generic, Union, overload

from numpy.typing import ArrayLike

from .._core import MoistAir
from .._rows import Array, Record, T, expect, run
from ._streams import AirStream, Exchange, Freezing, WetStream, freezing_code, wet_all

__all__ = ["Mixed", "adiabatic", "adiabatic_at", "remainder"]


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
