"""Cooling below the wanted temperature to shed water, then heating back."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Generic, Union, overload

from numpy.typing import ArrayLike

from .._core import MoistAir
from .._rows import Array, Record, T, expect, run
from ._streams import AirStream
from .coil import CondensateTemperature, Cooling, condensate_choice
from .sensible import Sensible

__all__ = ["Reheat", "to_state"]


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
