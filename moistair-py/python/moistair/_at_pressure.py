"""Dew and frost points after a change of pressure."""

from __future__ import annotations

from typing import Any, Literal, Union, overload

from numpy.typing import ArrayLike

from ._formulation import Formulation, formulation_code
from ._quantities import QUANTITIES
from ._rows import Array, run

__all__ = ["saturation_temperature_after"]

_Point = Union[Literal["dew_point"], Literal["frost_point"]]


@overload
def saturation_temperature_after(
    *,
    pressure: float,
    new_pressure: float,
    wanted: _Point,
    dew_point: Union[float, None] = ...,
    frost_point: Union[float, None] = ...,
    formulation: Formulation = ...,
) -> float: ...
@overload
def saturation_temperature_after(
    *,
    pressure: ArrayLike,
    new_pressure: ArrayLike,
    wanted: _Point,
    dew_point: Union[ArrayLike, None] = ...,
    frost_point: Union[ArrayLike, None] = ...,
    formulation: Formulation = ...,
) -> Array: ...
def saturation_temperature_after(
    *,
    pressure: ArrayLike,
    new_pressure: ArrayLike,
    wanted: _Point,
    dew_point: Union[ArrayLike, None] = None,
    frost_point: Union[ArrayLike, None] = None,
    formulation: Formulation = "real_gas",
) -> Any:
    """Dew or frost point after a change of pressure: from a pressure dew point to the atmospheric one, or back.

    Below 0 °C a dew point of compressed air is mostly meant over ice: ask which, and give it by that name.

    Parameters
    ----------
    pressure : float or array_like
        That the given point belongs to, absolute, Pa.
    new_pressure : float or array_like
        The other pressure, absolute, Pa.
    wanted : {'dew_point', 'frost_point'}
        Whether the result is over liquid water (−40 to 200 °C) or over ice (−100 °C to melting).
    dew_point, frost_point : float or array_like
        What is given, one of the two, °C.
    formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
        As in `MoistAir`.

    Returns
    -------
    float or numpy.ndarray
        °C; NaN where a row of an array has none.

    Raises
    ------
    TypeError
        Not exactly one point.
    NoValueError
        Ice above its melting temperature, water above boiling, or a result out of its range.
    NotFiniteError, OutOfRangeError
        An input.

    Examples
    --------
    The 3 °C of a refrigeration dryer at 8 bar, in the free air.

    >>> import moistair
    >>> free = moistair.saturation_temperature_after(
    ...     dew_point=3.0, pressure=800_000.0, wanted="frost_point", new_pressure=101_325.0
    ... )
    >>> round(free, 1)
    -20.5
    """
    points = {"dew_point": dew_point, "frost_point": frost_point}
    given = [name for name, value in points.items() if value is not None]
    if len(given) != 1:
        raise TypeError("exactly one of dew_point and frost_point is needed")
    if wanted not in points:
        raise ValueError(f"wanted must be 'dew_point' or 'frost_point', not {wanted!r}")
    return run(
        "saturation_temperature_after",
        float,
        ("given", QUANTITIES[given[0]].code),
        (given[0], points[given[0]]),
        ("pressure", pressure),
        formulation_code(formulation),
        ("wanted", QUANTITIES[wanted].code),
        ("new_pressure", new_pressure),
    )
