"""Compressed air: what its water does when air is compressed, cooled and expanded.

Pressures are absolute; gauges show the excess over the atmosphere. Vessels and lines under pressure can burst, condensate
freezes in outdoor lines and after expansion, and blocks or breaks them: codes for pressure equipment and licensed practice
govern, and no figure here is a safety function.
"""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any, Generic, Union, overload

from numpy.typing import ArrayLike

from .._rows import Array, Record, T, run
from ._streams import AirStream, Exchange, WetStream, wet

__all__ = ["Compressed", "to_pressure"]


@dataclass(frozen=True, eq=False, init=False)
class Compressed(Record, Generic[T]):
    """Air that was brought to another pressure and temperature.

    Attributes
    ----------
    leaving : WetStream
        Air and all its water at the new pressure and temperature, before a separator.
    exchange : Exchange
        Work of compression less the heat of cooling, W, into the air; no water, what condenses goes along.
    condensate : float or numpy.ndarray
        Liquid and ice in the leaving air, kg/s: what a perfect separator drains.
    """

    leaving: WetStream[T]
    exchange: Exchange[T]
    condensate: T

    @property
    def separated(self) -> AirStream[T]:
        """The air after a perfect separator: saturated, if anything condensed."""
        return self.leaving.without_condensate


@overload
def to_pressure(
    entering: Union[AirStream[float], WetStream[float]], *, pressure: float, leaving_temperature: float
) -> Compressed[float]: ...
@overload
def to_pressure(
    entering: Union[AirStream[Any], WetStream[Any]], *, pressure: ArrayLike, leaving_temperature: ArrayLike
) -> Compressed[Array]: ...
def to_pressure(
    entering: Union[AirStream[Any], WetStream[Any]], *, pressure: ArrayLike, leaving_temperature: ArrayLike
) -> Compressed[Any]:
    """Brings air to a pressure and temperature, by whatever machine, and lets its water come to equilibrium there.

    A compressor with its aftercooler, a refrigeration dryer, or an expansion. Below the melting temperature what condenses
    is ice: frost, or a blocked line. The exchange counts work and heat together; how much of either depends on the machine.

    Parameters
    ----------
    entering : AirStream or WetStream
        The air that enters.
    pressure : float or array_like
        Absolute pressure that it leaves at, Pa, 20 000 to 1 100 000.
    leaving_temperature : float or array_like
        Dry bulb that leaves, °C, −80 to 150.

    Returns
    -------
    Compressed

    Raises
    ------
    NotFiniteError, OutOfRangeError
        The pressure or the temperature.

    Examples
    --------
    To 8 bar and 35 °C behind the aftercooler, the drained air expanded at the tool.

    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, compression
    >>> outdoor = MoistAir(dry_bulb=30.0, relative_humidity=0.6, pressure=101_325.0)
    >>> line = compression.to_pressure(
    ...     AirStream(outdoor, dry_air_flow=1.0), pressure=800_000.0, leaving_temperature=35.0
    ... )
    >>> round(line.condensate * 3600.0)
    42
    >>> tool = compression.to_pressure(line.separated, pressure=101_325.0, leaving_temperature=20.0)
    >>> round(tool.separated.air.relative_humidity, 2)
    0.31
    """
    return run(
        "compression.to_pressure",
        Compressed,
        ("entering", wet(entering, "entering")),
        ("pressure", pressure),
        ("leaving_temperature", leaving_temperature),
    )
