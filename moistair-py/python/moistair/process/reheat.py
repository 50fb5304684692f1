"""Cooling below the wanted temperature to shed water, then heating back."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

from numpy.typing import ArrayLike

from .._core import MoistAir
from .._rows import Array, Record, T, expect, run
from ._streams import AirStream, code
from .coil import CondensateTemperature, Cooling, condensate_choice
from .sensible import Sensible

__all__ = ["Reheat", "to_state", "with_coil"]

#: What a coil is known by: the relative humidity of the air that it leaves, or its bypass factor.
CoilLeaving = Union[Literal["relative_humidity"], Literal["bypass"]]

_CHARACTERISTICS = {"relative_humidity": 0, "bypass": 1}


def leaving_choice(value: Any, characteristic: Any, coldest: Any) -> tuple[tuple[str, Any], ...]:
    return (
        ("coil_leaving", code(_CHARACTERISTICS, characteristic, "characteristic")[1]),
        ("coil_leaving.fraction", value),
        ("coil_leaving.coldest", coldest),
    )


@dataclass(frozen=True, eq=False, init=False)
class Reheat(Record, Generic[T]):
    """A coil and the heater behind it.

    Attributes
    ----------
    cooling : Cooling
        The coil.
    heating : Sensible
        The heater.
    reheat : float or numpy.ndarray
        Heat of the heater, W, positive.
    reheat_fraction : float or numpy.ndarray
        Reheat over cooling load: how much of the cooling is undone; NaN without a load.
    """

    cooling: Cooling[T]
    heating: Sensible[T]
    reheat: T
    reheat_fraction: T


@overload
def to_state(
    entering: AirStream[float],
    *,
    target: MoistAir[float],
    coil_leaving_relative_humidity: float,
    condensate_temperature: Union[CondensateTemperature, float] = ...,
) -> Reheat[float]: ...
@overload
def to_state(
    entering: AirStream[Any],
    *,
    target: MoistAir[Any],
    coil_leaving_relative_humidity: ArrayLike,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = ...,
) -> Reheat[Array]: ...
def to_state(
    entering: AirStream[Any],
    *,
    target: MoistAir[Any],
    coil_leaving_relative_humidity: ArrayLike,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air",
) -> Reheat[Any]:
    """Reaches a target state by cooling to its humidity ratio, then heating.

    Codes restrict simultaneous heating and cooling; this reports the reheat and does not judge it.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    target : MoistAir
        State to be reached.
    coil_leaving_relative_humidity : float or array_like
        Fraction, 0.2 to 1; 1 for full contact, 0.90 to 0.95 is common practice (no source).
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.

    Returns
    -------
    Reheat

    Raises
    ------
    InfeasibleError
        The target is moister than the entering air, or cooler than the coil would have to leave.
    ProcessError
        States of different formulations.
    NotFiniteError, OutOfRangeError
        An input.
    """
    expect(entering, AirStream, "entering")
    expect(target, MoistAir, "target")
    return run(
        "reheat.to_state",
        Reheat,
        ("entering", entering),
        ("target", target),
        ("coil_leaving_relative_humidity", coil_leaving_relative_humidity),
        *condensate_choice(condensate_temperature),
    )


@overload
def with_coil(
    entering: AirStream[float],
    *,
    target: MoistAir[float],
    coil_leaving: float,
    characteristic: CoilLeaving = ...,
    coldest: float = ...,
    condensate_temperature: Union[CondensateTemperature, float] = ...,
) -> Reheat[float]: ...
@overload
def with_coil(
    entering: AirStream[Any],
    *,
    target: MoistAir[Any],
    coil_leaving: ArrayLike,
    characteristic: CoilLeaving = ...,
    coldest: ArrayLike = ...,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = ...,
) -> Reheat[Array]: ...
def with_coil(
    entering: AirStream[Any],
    *,
    target: MoistAir[Any],
    coil_leaving: ArrayLike,
    characteristic: CoilLeaving = "relative_humidity",
    coldest: ArrayLike = 0.0,
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air",
) -> Reheat[Any]:
    """Reaches a target state by cooling to its humidity ratio on the characteristic of a coil, then heating.

    Codes restrict simultaneous heating and cooling; this reports the reheat and does not judge it.

    Parameters
    ----------
    entering : AirStream
        The air that enters.
    target : MoistAir
        State to be reached.
    coil_leaving : float or array_like
        Relative humidity of the air that the coil leaves, 0.2 to 1; or the bypass factor, 0 to below 1.
    characteristic : {'relative_humidity', 'bypass'}
        What the coil is known by.
    coldest : float or array_like
        The coldest apparatus dew point that the coil can hold, °C; read for `bypass` only.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.

    Returns
    -------
    Reheat

    Raises
    ------
    InfeasibleError
        Its `quantity` says what binds: the target is moister than the entering air, the bypass too large, the apparatus dew
        point below the coldest, or the target cooler than what the coil leaves.
    ProcessError
        States of different formulations.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    A coil with a tenth of bypass that holds 4 °C at the least.

    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, reheat
    >>> state = lambda t, rh: MoistAir(dry_bulb=t, relative_humidity=rh, pressure=101_325.0)
    >>> done = reheat.with_coil(
    ...     AirStream(state(27.0, 0.55), dry_air_flow=1.0),
    ...     target=state(20.0, 0.5), coil_leaving=0.1, characteristic="bypass", coldest=4.0,
    ... )
    >>> round(done.reheat, -3)
    10000.0
    """
    expect(entering, AirStream, "entering")
    expect(target, MoistAir, "target")
    return run(
        "reheat.with_coil",
        Reheat,
        ("entering", entering),
        ("target", target),
        *leaving_choice(coil_leaving, characteristic, coldest),
        *condensate_choice(condensate_temperature),
    )
