"""Air in motion, and what a process gives to it."""

from __future__ import annotations

from collections.abc import Iterable
from dataclasses import dataclass
from typing import Any, Generic, Literal, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._core import MAX_STREAMS, MoistAir
from .._formulation import Formulation, formulation_code
from .._rows import Array, Record, T, expect, run

__all__ = ["AirStream", "AirWithCondensate", "Exchange", "WetStream", "liquid_water_enthalpy"]

Freezing = Union[Literal["equilibrium"], Literal["supercooled"]]

_FREEZING = {"equilibrium": 0, "supercooled": 1}


def code(names: dict[str, int], value: Any, label: str) -> tuple[str, int]:
    """The code of a named choice."""
    if value not in names:
        raise ValueError(f"{label} must be {' or '.join(repr(name) for name in names)}, not {value!r}")
    return label, names[value]


def freezing_code(value: Any) -> tuple[str, int]:
    return code(_FREEZING, value, "freezing")


@dataclass(frozen=True, eq=False, init=False)
class AirStream(Record, Generic[T]):
    """Moist air with its dry-air mass flow.

    Parameters
    ----------
    air : MoistAir
        State of the air.
    dry_air_flow : float or array_like
        Dry-air mass flow, kg/s.

    Attributes
    ----------
    air : MoistAir
        State of the air.
    dry_air_flow : float or numpy.ndarray
        Dry-air mass flow, kg/s.
    volume_flow : float or numpy.ndarray
        Volume flow at the state of this air, m³/s.

    Raises
    ------
    NotFiniteError, OutOfRangeError
        A flow that is negative, absurd or no number.

    Examples
    --------
    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream
    >>> air = MoistAir(dry_bulb=20.0, relative_humidity=0.5, pressure=101_325.0)
    >>> stream = AirStream(air, dry_air_flow=2.0)
    >>> round(stream.volume_flow, 3)
    1.68
    >>> AirStream.from_volume_flow(air, volume_flow=1.68).dry_air_flow < 2.01
    True
    """

    air: MoistAir[T]
    dry_air_flow: T
    volume_flow: T

    _inputs = ("air", "dry_air_flow")

    @overload
    def __init__(self: AirStream[float], air: MoistAir[float], *, dry_air_flow: float) -> None: ...
    @overload
    def __init__(self: AirStream[Array], air: MoistAir[Any], *, dry_air_flow: ArrayLike) -> None: ...
    def __init__(self, air: MoistAir[Any], *, dry_air_flow: ArrayLike) -> None:
        expect(air, MoistAir, "air")
        self.__dict__.update(run("stream", AirStream, ("air", air), ("dry_air_flow", dry_air_flow)).__dict__)

    @overload
    @staticmethod
    def from_volume_flow(air: MoistAir[float], *, volume_flow: float) -> AirStream[float]: ...
    @overload
    @staticmethod
    def from_volume_flow(air: MoistAir[Any], *, volume_flow: ArrayLike) -> AirStream[Array]: ...
    @staticmethod
    def from_volume_flow(air: MoistAir[Any], *, volume_flow: ArrayLike) -> AirStream[Any]:
        """From a volume flow, m³/s, measured at the state of this air."""
        expect(air, MoistAir, "air")
        return run("stream.from_volume_flow", AirStream, ("air", air), ("volume_flow", volume_flow))

    @overload
    @staticmethod
    def from_standard_volume_flow(
        air: MoistAir[float], *, volume_flow: float, reference_density: float
    ) -> AirStream[float]: ...
    @overload
    @staticmethod
    def from_standard_volume_flow(
        air: MoistAir[Any], *, volume_flow: ArrayLike, reference_density: ArrayLike
    ) -> AirStream[Array]: ...
    @staticmethod
    def from_standard_volume_flow(
        air: MoistAir[Any], *, volume_flow: ArrayLike, reference_density: ArrayLike
    ) -> AirStream[Any]:
        """From a standard volume flow, m³/s: that of the dry air at a stated reference density, kg/m³, such as 1.2."""
        expect(air, MoistAir, "air")
        return run(
            "stream.from_standard_volume_flow",
            AirStream,
            ("air", air),
            ("volume_flow", volume_flow),
            ("reference_density", reference_density),
        )


@dataclass(frozen=True, eq=False, init=False)
class AirWithCondensate(Record, Generic[T]):
    """Moist air with the liquid water and ice that it carries: fog, ice fog, droplets.

    Parameters
    ----------
    air : MoistAir
        The gas phase.
    liquid, ice : float or array_like
        kg per kg of dry air, at the temperature of the air.

    Attributes
    ----------
    air : MoistAir
        The gas phase.
    liquid, ice : float or numpy.ndarray
        kg per kg of dry air.
    total_water : float or numpy.ndarray
        Vapor, liquid and ice together, kg per kg of dry air.
    specific_enthalpy : float or numpy.ndarray
        Of the air and its condensate, J per kg of dry air.
    is_wet : bool or numpy.ndarray
        Whether there is any condensate.

    Examples
    --------
    Equal parts of air at 30 °C, 90 % and at −10 °C, 80 % make fog.

    >>> from moistair.process import AirWithCondensate
    >>> fog = AirWithCondensate.from_enthalpy_and_water(
    ...     specific_enthalpy=42_900.0, total_water=0.01284, pressure=101_325.0, formulation="ideal_gas"
    ... )
    >>> fog.is_wet, round(fog.air.dry_bulb, 1)
    (True, 15.3)
    """

    air: MoistAir[T]
    liquid: T
    ice: T
    total_water: T
    specific_enthalpy: T
    is_wet: Union[bool, NDArray[np.bool_]]

    _inputs = ("air", "liquid", "ice")

    @overload
    def __init__(
        self: AirWithCondensate[float], air: MoistAir[float], *, liquid: float = ..., ice: float = ...
    ) -> None: ...
    @overload
    def __init__(
        self: AirWithCondensate[Array], air: MoistAir[Any], *, liquid: ArrayLike = ..., ice: ArrayLike = ...
    ) -> None: ...
    def __init__(self, air: MoistAir[Any], *, liquid: ArrayLike = 0.0, ice: ArrayLike = 0.0) -> None:
        expect(air, MoistAir, "air")
        made = run("wet_air", AirWithCondensate, ("air", air), ("liquid", liquid), ("ice", ice))
        self.__dict__.update(made.__dict__)

    @overload
    @staticmethod
    def from_dry_bulb_and_water(
        *,
        dry_bulb: float,
        total_water: float,
        pressure: float,
        freezing: Freezing = ...,
        formulation: Formulation = ...,
    ) -> AirWithCondensate[float]: ...
    @overload
    @staticmethod
    def from_dry_bulb_and_water(
        *,
        dry_bulb: ArrayLike,
        total_water: ArrayLike,
        pressure: ArrayLike,
        freezing: Freezing = ...,
        formulation: Formulation = ...,
    ) -> AirWithCondensate[Array]: ...
    @staticmethod
    def from_dry_bulb_and_water(
        *,
        dry_bulb: ArrayLike,
        total_water: ArrayLike,
        pressure: ArrayLike,
        freezing: Freezing = "equilibrium",
        formulation: Formulation = "real_gas",
    ) -> AirWithCondensate[Any]:
        """Vapor and condensate in equilibrium at a temperature, from the water of all phases together.

        As much vapor as the air holds; the rest is ice below the melting temperature and liquid from there on (liquid down to
        −40 °C if supercooled).

        Parameters
        ----------
        dry_bulb : float or array_like
            °C.
        total_water : float or array_like
            kg per kg of dry air.
        pressure : float or array_like
            Pa.
        freezing : {'equilibrium', 'supercooled'}
            Whether condensate below the melting temperature is ice.
        formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
            As in `MoistAir`.

        Raises
        ------
        NotFiniteError, OutOfRangeError
            An input.
        """
        return run(
            "wet_air.from_dry_bulb_and_water",
            AirWithCondensate,
            ("dry_bulb", dry_bulb),
            ("total_water", total_water),
            freezing_code(freezing),
            ("pressure", pressure),
            formulation_code(formulation),
        )

    @overload
    @staticmethod
    def from_enthalpy_and_water(
        *,
        specific_enthalpy: float,
        total_water: float,
        pressure: float,
        freezing: Freezing = ...,
        formulation: Formulation = ...,
    ) -> AirWithCondensate[float]: ...
    @overload
    @staticmethod
    def from_enthalpy_and_water(
        *,
        specific_enthalpy: ArrayLike,
        total_water: ArrayLike,
        pressure: ArrayLike,
        freezing: Freezing = ...,
        formulation: Formulation = ...,
    ) -> AirWithCondensate[Array]: ...
    @staticmethod
    def from_enthalpy_and_water(
        *,
        specific_enthalpy: ArrayLike,
        total_water: ArrayLike,
        pressure: ArrayLike,
        freezing: Freezing = "equilibrium",
        formulation: Formulation = "real_gas",
    ) -> AirWithCondensate[Any]:
        """Vapor, liquid and ice in equilibrium, from the enthalpy and the water of all phases together.

        Parameters
        ----------
        specific_enthalpy : float or array_like
            J per kg of dry air.
        total_water : float or array_like
            kg per kg of dry air.
        pressure : float or array_like
            Pa.
        freezing : {'equilibrium', 'supercooled'}
            Whether condensate below the melting temperature is ice, or liquid as in fog down to about −15 °C.
        formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
            As in `MoistAir`.

        Raises
        ------
        InfeasibleError
            The result would leave the range of states.
        NotFiniteError, OutOfRangeError
            An input.
        """
        return run(
            "wet_air.from_enthalpy_and_water",
            AirWithCondensate,
            ("specific_enthalpy", specific_enthalpy),
            ("total_water", total_water),
            freezing_code(freezing),
            ("pressure", pressure),
            formulation_code(formulation),
        )


@dataclass(frozen=True, eq=False, init=False)
class WetStream(Record, Generic[T]):
    """Air that may carry condensate, with its dry-air mass flow.

    Parameters
    ----------
    air : AirWithCondensate or MoistAir
        State of the air.
    dry_air_flow : float or array_like
        Dry-air mass flow, kg/s.

    Attributes
    ----------
    air : AirWithCondensate
        State of the air.
    dry_air_flow : float or numpy.ndarray
        Dry-air mass flow, kg/s.
    """

    air: AirWithCondensate[T]
    dry_air_flow: T

    @overload
    def __init__(
        self: WetStream[float], air: Union[AirWithCondensate[float], MoistAir[float]], *, dry_air_flow: float
    ) -> None: ...
    @overload
    def __init__(
        self: WetStream[Array], air: Union[AirWithCondensate[Any], MoistAir[Any]], *, dry_air_flow: ArrayLike
    ) -> None: ...
    def __init__(self, air: Union[AirWithCondensate[Any], MoistAir[Any]], *, dry_air_flow: ArrayLike) -> None:
        if isinstance(air, MoistAir):
            air = AirWithCondensate(air)
        expect(air, AirWithCondensate, "air")
        self.__dict__.update(run("wet_stream", WetStream, ("air", air), ("dry_air_flow", dry_air_flow)).__dict__)

    @property
    def without_condensate(self) -> AirStream[T]:
        """The stream of the gas alone."""
        return AirStream(self.air.air, dry_air_flow=self.dry_air_flow)  # type: ignore[call-overload,no-any-return]


@dataclass(frozen=True, eq=False, init=False)
class Exchange(Record, Generic[T]):
    """What a process gave to the air: positive into the air.

    Attributes
    ----------
    heat : float or numpy.ndarray
        Heat through a surface or a heater, W.
    water : float or numpy.ndarray
        Water, kg/s; negative for condensate.
    water_enthalpy_flow : float or numpy.ndarray
        Enthalpy that came with that water, W.
    """

    heat: T
    water: T
    water_enthalpy_flow: T


def wet(stream: Union[AirStream[Any], WetStream[Any]], label: str) -> WetStream[Any]:
    """A stream as one that may carry condensate."""
    if isinstance(stream, AirStream):
        return WetStream(stream.air, dry_air_flow=stream.dry_air_flow)
    expect(stream, WetStream, label)
    return stream


def wet_all(streams: Iterable[Union[AirStream[Any], WetStream[Any]]], label: str) -> list[tuple[str, WetStream[Any]]]:
    """Streams, named by their places."""
    named = [(f"{label}[{i}]", wet(stream, f"{label}[{i}]")) for i, stream in enumerate(streams)]
    if len(named) > MAX_STREAMS:
        raise ValueError(f"{label} may be at most {MAX_STREAMS}, not {len(named)}")
    return named


@overload
def liquid_water_enthalpy(
    *, water_temperature: float, pressure: float, formulation: Formulation = ...
) -> float: ...
@overload
def liquid_water_enthalpy(
    *, water_temperature: ArrayLike, pressure: ArrayLike, formulation: Formulation = ...
) -> Array: ...
def liquid_water_enthalpy(
    *, water_temperature: ArrayLike, pressure: ArrayLike, formulation: Formulation = "real_gas"
) -> Any:
    """Enthalpy of liquid water, J/kg, on the datum of a formulation.

    Parameters
    ----------
    water_temperature : float or array_like
        °C, 0 to 200.
    pressure : float or array_like
        Pa.
    formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
        As in `MoistAir`.

    Returns
    -------
    float or numpy.ndarray
        J/kg; NaN where a row of an array is out of range.

    Examples
    --------
    >>> from moistair.process import liquid_water_enthalpy
    >>> round(liquid_water_enthalpy(water_temperature=20.0, pressure=101_325.0) / 1000.0, 1)
    84.0
    """
    return run(
        "liquid_water_enthalpy",
        float,
        ("water_temperature", water_temperature),
        ("pressure", pressure),
        formulation_code(formulation),
    )
