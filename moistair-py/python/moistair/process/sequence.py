"""A chain of processes, one behind the other, and its books.

`run` takes a stream through a list of steps and adds up heat, water and work, by step and in total; the books of the whole
chain are recomputed from its ends. `solve` finds one number of one step from a property that the air is to have: the leaving
temperature of a coil that gives a room its humidity, for one.

Each step is the process of its name, with the same bits as that alone. Droplets and ice on their way: `Mix`, `Compress` and
`Eliminate` take them; `ToTemperature` (upward) and `WithHeat` evaporate what the air then holds; every other step refuses
them: its model has no droplets. Put `Eliminate` before it.

A chain is a steady state; it knows no control and no dynamics. Results are estimates for engineering, not a safety function:
each process names its own cautions. A frost flag is no freezestat.
"""

from __future__ import annotations

import enum
from collections.abc import Iterable
from dataclasses import dataclass
from typing import Any, Generic, Literal, Optional, Union, overload

import numpy as np
from numpy.typing import ArrayLike, NDArray

from .._core import MAX_STEPS, MoistAir
from .._quantities import QUANTITIES
from .._rows import Array, Record, T, choice, expect, run_sequence
from ._streams import AirStream, Exchange, WetStream, code, wet
from .books import Books
from .coil import ARRANGEMENTS, Arrangement, CondensateTemperature, condensate_choice

__all__ = [
    "CoilByBypassFactor",
    "CoilToState",
    "CoilToTemperature",
    "CoilWithReheat",
    "CoilWithWater",
    "Compress",
    "DesiccantByEffectiveness",
    "DesiccantToHumidityRatio",
    "DirectCooler",
    "Done",
    "Eliminate",
    "End",
    "Evaporative",
    "IndirectCooler",
    "Loads",
    "Mix",
    "Refusal",
    "Room",
    "SolveStatus",
    "Solved",
    "Spray",
    "Steam",
    "SteamToHumidityRatio",
    "SteamToRelativeHumidity",
    "Step",
    "StepRegime",
    "StepResult",
    "ToTemperature",
    "Total",
    "Wash",
    "WithHeat",
    "run",
    "solve",
]

#: Toward which temperature of the secondary air an indirect cooler is counted.
EffectivenessOf = Union[Literal["wet_bulb"], Literal["dew_point"]]

#: Where the moisture of a room comes from.
MoistureSource = Union[Literal["saturated_vapor"], Literal["liquid"], Literal["enthalpy"]]

#: What the matrix of a desiccant wheel brings from the regeneration.
CarryOver = Union[Literal["none"], Literal["heat"], Literal["rise"]]

_CARRY_OVER = {"none": 0, "heat": 1, "rise": 2}

Arguments = tuple[tuple[str, Any], ...]


class Step:
    """One process of a chain: an instance of one of the classes of this module. Its numbers may be arrays."""

    _kind: int

    def _arguments(self) -> Arguments:
        raise TypeError("a step is made by one of the classes of moistair.process.sequence")


@dataclass(frozen=True, eq=False)
class ToTemperature(Step):
    """Heating or cooling to a temperature, as `sensible.to_temperature`.

    Parameters
    ----------
    leaving_temperature : float or array_like
        °C.
    """

    _kind = 1
    leaving_temperature: ArrayLike

    def _arguments(self) -> Arguments:
        return (("leaving_temperature", self.leaving_temperature),)


@dataclass(frozen=True, eq=False)
class WithHeat(Step):
    """Heating or cooling by a heat flow, as `sensible.with_heat`.

    Parameters
    ----------
    heat_flow : float or array_like
        W, positive into the air.
    """

    _kind = 2
    heat_flow: ArrayLike

    def _arguments(self) -> Arguments:
        return (("heat_flow", self.heat_flow),)


@dataclass(frozen=True, eq=False)
class CoilToState(Step):
    """A coil that leaves a state, as `coil.to_state`.

    Parameters
    ----------
    leaving : MoistAir
        State that leaves.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.
    """

    _kind = 10
    leaving: MoistAir[Any]
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air"

    def _arguments(self) -> Arguments:
        expect(self.leaving, MoistAir, "leaving")
        return (("leaving", self.leaving), *condensate_choice(self.condensate_temperature))


@dataclass(frozen=True, eq=False)
class CoilToTemperature(Step):
    """A coil that leaves a temperature and a relative humidity.

    Where that would be moister than the air that enters, the coil stays dry: the air keeps its humidity ratio.

    Parameters
    ----------
    leaving_temperature : float or array_like
        °C.
    relative_humidity : float or array_like
        Of a wet coil; 0.90 to 0.95 is common practice, no source.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.
    """

    _kind = 11
    leaving_temperature: ArrayLike
    relative_humidity: ArrayLike
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air"

    def _arguments(self) -> Arguments:
        numbers = ("leaving_temperature", self.leaving_temperature), ("relative_humidity", self.relative_humidity)
        return (*numbers, *condensate_choice(self.condensate_temperature))


@dataclass(frozen=True, eq=False)
class CoilByBypassFactor(Step):
    """A coil by its apparatus, as `coil.by_bypass_factor`.

    Parameters
    ----------
    apparatus_dew_point : float or array_like
        °C.
    bypass_factor : float or array_like
        0 to 1.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.
    """

    _kind = 12
    apparatus_dew_point: ArrayLike
    bypass_factor: ArrayLike
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air"

    def _arguments(self) -> Arguments:
        numbers = ("apparatus_dew_point", self.apparatus_dew_point), ("bypass_factor", self.bypass_factor)
        return (*numbers, *condensate_choice(self.condensate_temperature))


@dataclass(frozen=True, eq=False)
class CoilWithWater(Step):
    """A coil by its conductances and its water, cooling or heating, as `coil.with_water`.

    Parameters
    ----------
    air_side, water_side : float or array_like
        Conductances, W/K.
    water_flow : float or array_like
        kg/s.
    entering_water : float or array_like
        °C.
    specific_heat : 'water', float or array_like
        Of a brine that does not freeze, J/(kg K).
    arrangement : {'counterflow', 'cross_flow'}
        Cross-flow is for coils that stay dry.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.
    """

    _kind = 13
    air_side: ArrayLike
    water_side: ArrayLike
    water_flow: ArrayLike
    entering_water: ArrayLike
    specific_heat: Union[Literal["water"], ArrayLike] = "water"
    arrangement: Arrangement = "counterflow"
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air"

    def _arguments(self) -> Arguments:
        return (
            ("air_side", self.air_side),
            ("water_side", self.water_side),
            code(ARRANGEMENTS, self.arrangement, "arrangement"),
            ("water_flow", self.water_flow),
            ("entering_water", self.entering_water),
            *choice(self.specific_heat, {"water": 0}, "specific_heat"),
            *condensate_choice(self.condensate_temperature),
        )


@dataclass(frozen=True, eq=False)
class CoilWithReheat(Step):
    """A coil and the heater behind it, to a state, as `reheat.to_state`.

    Parameters
    ----------
    target : MoistAir
        The air that leaves the heater.
    coil_leaving_relative_humidity : float or array_like
        0.2 to 1.
    condensate_temperature : 'leaving_air', 'apparatus', float or array_like
        Temperature at which the condensate leaves, °C.
    """

    _kind = 14
    target: MoistAir[Any]
    coil_leaving_relative_humidity: ArrayLike
    condensate_temperature: Union[CondensateTemperature, ArrayLike] = "leaving_air"

    def _arguments(self) -> Arguments:
        expect(self.target, MoistAir, "target")
        humidity = ("coil_leaving_relative_humidity", self.coil_leaving_relative_humidity)
        return (("target", self.target), humidity, *condensate_choice(self.condensate_temperature))


@dataclass(frozen=True, eq=False)
class Steam(Step):
    """Steam of a flow, as `humidify.steam`.

    Parameters
    ----------
    steam_flow : float or array_like
        kg/s.
    steam_enthalpy : float or array_like
        J/kg.
    """

    _kind = 20
    steam_flow: ArrayLike
    steam_enthalpy: ArrayLike

    def _arguments(self) -> Arguments:
        return ("steam_flow", self.steam_flow), ("steam_enthalpy", self.steam_enthalpy)


@dataclass(frozen=True, eq=False)
class SteamToHumidityRatio(Step):
    """Steam up to a humidity ratio, as `humidify.steam_to_humidity_ratio`.

    Parameters
    ----------
    humidity_ratio : float or array_like
        kg/kg.
    steam_enthalpy : float or array_like
        J/kg.
    """

    _kind = 21
    humidity_ratio: ArrayLike
    steam_enthalpy: ArrayLike

    def _arguments(self) -> Arguments:
        return ("humidity_ratio", self.humidity_ratio), ("steam_enthalpy", self.steam_enthalpy)


@dataclass(frozen=True, eq=False)
class SteamToRelativeHumidity(Step):
    """Steam up to a relative humidity, as `humidify.steam_to_relative_humidity`.

    Parameters
    ----------
    relative_humidity : float or array_like
        0 to 1.
    steam_enthalpy : float or array_like
        J/kg.
    """

    _kind = 22
    relative_humidity: ArrayLike
    steam_enthalpy: ArrayLike

    def _arguments(self) -> Arguments:
        return ("relative_humidity", self.relative_humidity), ("steam_enthalpy", self.steam_enthalpy)


@dataclass(frozen=True, eq=False)
class Spray(Step):
    """Water sprayed in, as `humidify.spray`.

    Parameters
    ----------
    water_flow : float or array_like
        kg/s.
    water_temperature : float or array_like
        °C.
    """

    _kind = 23
    water_flow: ArrayLike
    water_temperature: ArrayLike

    def _arguments(self) -> Arguments:
        return ("water_flow", self.water_flow), ("water_temperature", self.water_temperature)


@dataclass(frozen=True, eq=False)
class Evaporative(Step):
    """Wetted media, as `humidify.evaporative`.

    Parameters
    ----------
    saturation_effectiveness : float or array_like
        0 to 1.
    water_temperature : 'wet_bulb', float or array_like
        Of the water that evaporates, °C.
    """

    _kind = 24
    saturation_effectiveness: ArrayLike
    water_temperature: Union[Literal["wet_bulb"], ArrayLike] = "wet_bulb"

    def _arguments(self) -> Arguments:
        water = choice(self.water_temperature, {"wet_bulb": 0}, "water_temperature")
        return (("saturation_effectiveness", self.saturation_effectiveness), *water)


@dataclass(frozen=True, eq=False)
class DirectCooler(Step):
    """Wetted media with circulating water, pump and bleed: a direct evaporative cooler, or a humidifier.

    Parameters
    ----------
    saturation_effectiveness : float or array_like
        Toward the temperature of the circulating water, 0 to 1.
    circulating_flow : float or array_like
        Water over the medium, kg/s.
    pump_heat : float or array_like
        Power of the pump, W.
    make_up_temperature : 'wet_bulb', float or array_like
        Of the make-up: that of the circulating water, or stated, °C.
    drift_fraction : float or array_like
        Droplets carried over, as a share of the circulating water.
    cycles_of_concentration : float or array_like
        That the bleed keeps.
    """

    _kind = 25
    saturation_effectiveness: ArrayLike
    circulating_flow: ArrayLike
    pump_heat: ArrayLike = 0.0
    make_up_temperature: Union[Literal["wet_bulb"], ArrayLike] = "wet_bulb"
    drift_fraction: ArrayLike = 0.0
    cycles_of_concentration: ArrayLike = 3.0

    def _arguments(self) -> Arguments:
        return (
            ("saturation_effectiveness", self.saturation_effectiveness),
            ("circulating_flow", self.circulating_flow),
            ("pump_heat", self.pump_heat),
            *choice(self.make_up_temperature, {"wet_bulb": 0}, "make_up_temperature"),
            ("drift_fraction", self.drift_fraction),
            ("cycles_of_concentration", self.cycles_of_concentration),
        )


@dataclass(frozen=True, eq=False)
class Wash(Step):
    """A washer: much water, of any temperature, in short contact with the air.

    Parameters
    ----------
    water_flow : float or array_like
        Water sprayed, kg/s.
    water_temperature : float or array_like
        °C; chilled below the dew point it takes water out of the air.
    effectiveness : float or array_like
        How far the air comes toward the temperature of the water that leaves, 0 to 1.
    pump_heat : float or array_like
        Power of the pump, W.
    carry_over_fraction : float or array_like
        Droplets that pass the eliminators, over the water sprayed.
    """

    _kind = 26
    water_flow: ArrayLike
    water_temperature: ArrayLike
    effectiveness: ArrayLike
    pump_heat: ArrayLike = 0.0
    carry_over_fraction: ArrayLike = 0.0

    def _arguments(self) -> Arguments:
        return (
            ("water_flow", self.water_flow),
            ("water_temperature", self.water_temperature),
            ("effectiveness", self.effectiveness),
            ("pump_heat", self.pump_heat),
            ("carry_over_fraction", self.carry_over_fraction),
        )


@dataclass(frozen=True, eq=False)
class Mix(Step):
    """Another stream mixed in, outdoor air or return air, as `mixing.adiabatic`.

    Parameters
    ----------
    stream : AirStream or WetStream
        The other stream.
    """

    _kind = 30
    stream: Union[AirStream[Any], WetStream[Any]]

    def _arguments(self) -> Arguments:
        return (("stream", wet(self.stream, "stream")),)


@dataclass(frozen=True, eq=False)
class Eliminate(Step):
    """All droplets and ice taken out of the air at its own temperature: a perfect eliminator. Real ones pass the finest."""

    _kind = 31

    def _arguments(self) -> Arguments:
        return ()


@dataclass(frozen=True, eq=False)
class Compress(Step):
    """Another pressure and temperature, by whatever machine, as `compression.to_pressure`.

    Parameters
    ----------
    pressure : float or array_like
        Pa, absolute.
    leaving_temperature : float or array_like
        °C.
    """

    _kind = 40
    pressure: ArrayLike
    leaving_temperature: ArrayLike

    def _arguments(self) -> Arguments:
        return ("pressure", self.pressure), ("leaving_temperature", self.leaving_temperature)


@dataclass(frozen=True, eq=False)
class IndirectCooler(Step):
    """Indirect evaporative cooling, of which this air is the primary side.

    Parameters
    ----------
    secondary : AirStream
        The air that is wetted behind the wall.
    effectiveness : float or array_like
        How far the primary air is cooled, if it stays dry.
    exhaust_humidity : float or array_like
        Relative humidity over liquid at which the secondary air leaves.
    effectiveness_of : {'wet_bulb', 'dew_point'}
        Toward which temperature of the secondary air.
    pump_heat : float or array_like
        Power of the pump, W.
    water_temperature : 'wet_bulb', float or array_like
        Of the water that evaporates, °C.
    """

    _kind = 61
    secondary: AirStream[Any]
    effectiveness: ArrayLike
    exhaust_humidity: ArrayLike
    effectiveness_of: EffectivenessOf = "wet_bulb"
    pump_heat: ArrayLike = 0.0
    water_temperature: Union[Literal["wet_bulb"], ArrayLike] = "wet_bulb"

    def _arguments(self) -> Arguments:
        expect(self.secondary, AirStream, "secondary")
        return (
            ("secondary", self.secondary),
            code({"wet_bulb": 0, "dew_point": 1}, self.effectiveness_of, "effectiveness_of"),
            ("effectiveness", self.effectiveness),
            ("exhaust_humidity", self.exhaust_humidity),
            ("pump_heat", self.pump_heat),
            *choice(self.water_temperature, {"wet_bulb": 0}, "water_temperature"),
        )


@dataclass(frozen=True, eq=False)
class Room(Step):
    """A room and its gains; what leaves is its air.

    Parameters
    ----------
    sensible : float or array_like
        Heat that comes without water, W; negative in a room that loses heat.
    moisture : float or array_like
        Water, kg/s; negative where it is taken out.
    moisture_source : {'saturated_vapor', 'liquid', 'enthalpy'}
        Where the water comes from.
    source_value : float or array_like
        Temperature of that vapor or liquid, °C, or its enthalpy, J/kg.
    """

    _kind = 70
    sensible: ArrayLike
    moisture: ArrayLike
    moisture_source: MoistureSource = "saturated_vapor"
    source_value: ArrayLike = 32.0

    def _arguments(self) -> Arguments:
        return (
            ("sensible", self.sensible),
            ("moisture", self.moisture),
            code({"saturated_vapor": 0, "liquid": 1, "enthalpy": 2}, self.moisture_source, "moisture_source"),
            ("source_value", self.source_value),
        )


@dataclass(frozen=True, eq=False)
class DesiccantToHumidityRatio(Step):
    """A desiccant, to a humidity ratio.

    Parameters
    ----------
    humidity_ratio : float or array_like
        kg/kg.
    sorption_heat_ratio : float or array_like
        Heat of sorption over heat of vaporization; about 1.05 to 1.15 for silica gel (common practice, no source).
    carry_over : {'none', 'heat', 'rise'}
        What the matrix of a wheel brings from the regeneration: nothing, a heat, W, or a rise of the leaving temperature, K.
    carry_over_value : float or array_like
        How much.
    """

    _kind = 80
    humidity_ratio: ArrayLike
    sorption_heat_ratio: ArrayLike
    carry_over: CarryOver = "none"
    carry_over_value: ArrayLike = 0.0

    def _arguments(self) -> Arguments:
        return (
            ("humidity_ratio", self.humidity_ratio),
            ("sorption_heat_ratio", self.sorption_heat_ratio),
            code(_CARRY_OVER, self.carry_over, "carry_over"),
            ("carry_over_value", self.carry_over_value),
        )


@dataclass(frozen=True, eq=False)
class DesiccantByEffectiveness(Step):
    """A desiccant by its effectiveness, (W₁ − W₂) / (W₁ − W_least).

    Parameters
    ----------
    drying_effectiveness : float or array_like
        0 to 1.
    sorption_heat_ratio : float or array_like
        Heat of sorption over heat of vaporization.
    driest : float or array_like
        Humidity ratio that the desiccant could reach at best, kg/kg; 0 for the common definition.
    carry_over : {'none', 'heat', 'rise'}
        As in `DesiccantToHumidityRatio`.
    carry_over_value : float or array_like
        How much.
    """

    _kind = 81
    drying_effectiveness: ArrayLike
    sorption_heat_ratio: ArrayLike
    driest: ArrayLike = 0.0
    carry_over: CarryOver = "none"
    carry_over_value: ArrayLike = 0.0

    def _arguments(self) -> Arguments:
        return (
            ("drying_effectiveness", self.drying_effectiveness),
            ("driest", self.driest),
            ("sorption_heat_ratio", self.sorption_heat_ratio),
            code(_CARRY_OVER, self.carry_over, "carry_over"),
            ("carry_over_value", self.carry_over_value),
        )


class StepRegime(enum.IntEnum):
    """Whether and how water condensed in a step."""

    NO_COIL = -1
    """The step is no coil."""
    DRY = 0
    """No condensate."""
    WET = 1
    """Liquid condensate."""
    FROST = 2
    """Frost, which no steady state describes."""
    PARTLY_WET = 3
    """Liquid condensate on a part of the surface."""


@dataclass(frozen=True, eq=False, init=False)
class Loads(Record, Generic[T]):
    """What a step asks of the plant, or all steps together, by name.

    Magnitudes, unless they are said to be signed: then into the air.

    Attributes
    ----------
    heating : float or numpy.ndarray
        Heat from heaters and warm coils, W.
    cooling : float or numpy.ndarray
        Heat taken out by coils and dry coolers, W.
    sensible_cooling, latent_cooling : float or numpy.ndarray
        Its parts, W.
    recovered : float or numpy.ndarray
        Heat from another stream through an indirect cooler, or carried over by a desiccant, W;
        signed.
    gains : float or numpy.ndarray
        Sensible heat of rooms, W; signed.
    water_heat : float or numpy.ndarray
        Heat that circulating water brings with it: of its pump, of its make-up, of chilled spray, W; signed.
    fan_work : float or numpy.ndarray
        Power of fans that reaches the air, W: 0, as no step is a fan yet.
    fan_power : float or numpy.ndarray
        Electric power of fans, that part of it included, W: 0 likewise.
    compression : float or numpy.ndarray
        Of compression and expansion: work less the heat of cooling, W; signed.
    condensate : float or numpy.ndarray
        Water that drains from coils, eliminators, coolers and washers, kg/s.
    steam : float or numpy.ndarray
        Steam into the air, kg/s.
    humidifying_water : float or numpy.ndarray
        Liquid water into the air, with what it carries on as droplets, kg/s.
    moisture_gain : float or numpy.ndarray
        Moisture of rooms, kg/s; signed.
    recovered_water : float or numpy.ndarray
        Vapor from a desiccant, kg/s; signed.
    secondary_water : float or numpy.ndarray
        Water that evaporates into a secondary stream, not into this one, kg/s.
    mixed_in : float or numpy.ndarray
        Dry air of other streams mixed in, kg/s.
    """

    heating: T
    cooling: T
    sensible_cooling: T
    latent_cooling: T
    recovered: T
    gains: T
    water_heat: T
    fan_work: T
    fan_power: T
    compression: T
    condensate: T
    steam: T
    humidifying_water: T
    moisture_gain: T
    recovered_water: T
    secondary_water: T
    mixed_in: T


@dataclass(frozen=True, eq=False, init=False)
class StepResult(Record, Generic[T]):
    """What one step did.

    Attributes
    ----------
    entering, leaving : WetStream
        The air on both sides.
    exchange : Exchange
        Heat and water into the air.
    loads : Loads
        The same by name.
    regime : StepRegime or numpy.ndarray
        Of a coil: dry, wet or frosting; an int32 array of the codes for many rows, −1 also where a row has no result.
    frost : bool or numpy.ndarray
        Frost forms, or water in a coil may freeze. No freezestat.
    condenses : bool or numpy.ndarray
        Water condenses where no coil drains it: in an indirect cooler.
    books : Books
        What enters, with a stream mixed in, against what leaves.
    """

    entering: WetStream[T]
    leaving: WetStream[T]
    exchange: Exchange[T]
    loads: Loads[T]
    regime: Union[StepRegime, NDArray[np.int32]]
    frost: Union[bool, NDArray[np.bool_]]
    condenses: Union[bool, NDArray[np.bool_]]
    books: Books[T]


@dataclass(frozen=True, eq=False, init=False)
class Total(Record, Generic[T]):
    """What all steps did together.

    Attributes
    ----------
    leaving : WetStream
        The air that leaves the last step.
    exchange : Exchange
        The sum of all exchanges.
    loads : Loads
        The sum of all loads.
    frost : bool or numpy.ndarray
        Whether any step reports frost.
    condenses : bool or numpy.ndarray
        Whether any step reports condensation.
    books : Books
        What enters the first step and is mixed in, against what leaves the last and all that was exchanged; measured against
        the terms of these ends alone, and the rounding of each temperature that was solved for on the way.
    """

    leaving: WetStream[T]
    exchange: Exchange[T]
    loads: Loads[T]
    frost: Union[bool, NDArray[np.bool_]]
    condenses: Union[bool, NDArray[np.bool_]]
    books: Books[T]


@dataclass(frozen=True)
class Done(Generic[T]):
    """A chain that was run.

    Attributes
    ----------
    steps : tuple of StepResult
        What each step did.
    total : Total
        What they did together.
    """

    steps: tuple[StepResult[T], ...]
    total: Total[T]


class SolveStatus(enum.IntEnum):
    """How a solve ended."""

    SOLVED = 0
    """The property has its value."""
    NO_CROSSING = 1
    """The property is on one side of its value at both ends of the bracket, or of the part of it in which the chain runs."""
    JUMP = 2
    """The property jumps past its value; the nearer side is returned."""
    INTERRUPTED = 3
    """The chain fails between two ends at which it runs; the nearest value found is returned."""


@dataclass(frozen=True, eq=False, init=False)
class End(Record, Generic[T]):
    """A value of the free number and what the air then has.

    Attributes
    ----------
    number, reached : float or numpy.ndarray
        The free number, and the property.
    """

    number: T
    reached: T


@dataclass(frozen=True, eq=False, init=False)
class Refusal(Record, Generic[T]):
    """What stopped a chain where it does not run.

    Attributes
    ----------
    code : int or numpy.ndarray
        That of the error, as in ``status``; 0 for nothing.
    step : int or numpy.ndarray
        Which step, from 0; −1 for none.
    """

    code: Union[int, NDArray[np.int32]]
    step: Union[int, NDArray[np.int32]]


@dataclass(frozen=True, eq=False, init=False)
class _Found(Record, Generic[T]):
    how: Union[SolveStatus, NDArray[np.int32]]
    number: T
    reached: T
    residual: T
    low: End[T]
    high: End[T]
    refused: Refusal[T]
    evaluations: Union[int, NDArray[np.int32]]


@dataclass(frozen=True, eq=False, init=False)
class Solved(_Found[T]):
    """What a solve found.

    Attributes
    ----------
    how : SolveStatus or numpy.ndarray
        How it ended; an int32 array of the codes for many rows, −1 where a row has no result.
    number : float or numpy.ndarray
        The free number.
    reached : float or numpy.ndarray
        The property that the air has with it.
    residual : float or numpy.ndarray
        That less the wanted value.
    low, high : End
        The ends of the bracket, or of the part of it in which the chain runs.
    refused : Refusal
        What stopped the chain where it does not run.
    evaluations : int or numpy.ndarray
        How often the steps were evaluated for it.
    steps : tuple of StepResult
        What each step does with the number found.
    total : Total
        What they do together.
    """

    steps: tuple[StepResult[T], ...]
    total: Total[T]


def _chain(
    entering: Union[AirStream[Any], WetStream[Any]], steps: Iterable[Step]
) -> tuple[list[int], list[tuple[str, Any]]]:
    kinds, arguments = [], [("entering", wet(entering, "entering"))]
    for place, step in enumerate(steps):
        expect(step, Step, f"steps[{place}]")
        arguments += [(f"steps[{place}].{label}", value) for label, value in step._arguments()]
        kinds.append(step._kind)
    return kinds, arguments


def run(entering: Union[AirStream[T], WetStream[T]], steps: Iterable[Step]) -> Done[Any]:
    """Takes a stream through steps in their order.

    Parameters
    ----------
    entering : AirStream or WetStream
        What enters the first step.
    steps : iterable of Step
        In the order of the air. Numbers of streams and steps may be arrays, which broadcast together to rows.

    Returns
    -------
    Done
        Of floats for one row, of arrays for many.

    Raises
    ------
    MoistAirError
        That of the first step that fails; the message says which step. Later steps are not run. Of many rows, one that fails
        holds NaN and its ``status`` says why.

    Examples
    --------
    Outdoor air is mixed with return air, cooled and warmed a little.

    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, sequence
    >>> outdoor = MoistAir(dry_bulb=33.0, relative_humidity=0.45, pressure=101_325.0)
    >>> room = MoistAir(dry_bulb=24.0, relative_humidity=0.5, pressure=101_325.0)
    >>> steps = [
    ...     sequence.Mix(AirStream(room, dry_air_flow=1.4)),
    ...     sequence.CoilToTemperature(leaving_temperature=13.0, relative_humidity=0.95),
    ...     sequence.ToTemperature(15.0),
    ... ]
    >>> done = sequence.run(AirStream(outdoor, dry_air_flow=0.6), steps)
    >>> round(done.total.loads.cooling), round(done.steps[2].loads.heating), done.total.books.close
    (37691, 4091, True)
    """
    kinds, arguments = _chain(entering, steps)
    *done, total = run_sequence(kinds, [*[StepResult] * len(kinds), Total], arguments)
    return Done(steps=tuple(done), total=total)


def solve(
    entering: Union[AirStream[Any], WetStream[Any]],
    steps: Iterable[Step],
    *,
    free: tuple[int, str],
    low: ArrayLike,
    high: ArrayLike,
    wanted: str,
    value: ArrayLike,
    after: Optional[int] = None,
) -> Solved[Any]:
    """Finds the number of one step at which the air has a property, and runs the chain with it.

    The property need not be monotone: it is enough that it lies on two sides of its value at the ends of the bracket. Where
    the chain does not run at an end, that is drawn in to where it does, and `refused` says why; where it runs at neither end,
    15 points between are tried. Every path is the same for the same arguments. At most 179 evaluations of the steps from the
    free one on, about ten where the chain runs at both ends.

    Parameters
    ----------
    entering : AirStream or WetStream
        What enters the first step.
    steps : iterable of Step
        In the order of the air, at most 32.
    free : (int, str)
        The step whose number is free, from 0, and the quantity of the number, such as ``(1, 'leaving_temperature')``:
        `moistair.QUANTITIES` names them. 'conductance' is that of the air side of a coil, with the water side in proportion;
        'dry_air_mass_flow' that of a stream mixed in; 'heat_flow', 'water_flow', 'steam_enthalpy' and so on are what they say.
        What the step holds there is not used.
    low, high : float or array_like
        Where to look, in the unit of the quantity.
    wanted : str
        The property that the air is to have, as an attribute of `MoistAir` is named.
    value : float or array_like
        Its value.
    after : int, optional
        The step whose leaving air is meant, from 0, at or after the free one; the last by default.

    Returns
    -------
    Solved
        With `how` it ended.

    Raises
    ------
    MoistAirError
        The number is none of the step's, the bracket is empty or out of range, a step before the free one fails, the chain runs
        nowhere in the bracket, or a step behind the wanted air fails; the message says which step. Of many rows, one
        that fails holds NaN and its ``status`` says why.
    ValueError
        Names that are no quantities, more steps than 32.

    Examples
    --------
    The coil that gives supply air of 8.5 g/kg.

    >>> from moistair import MoistAir
    >>> from moistair.process import AirStream, sequence
    >>> air = MoistAir(dry_bulb=27.0, relative_humidity=0.52, pressure=101_325.0)
    >>> steps = [
    ...     sequence.CoilToTemperature(leaving_temperature=10.0, relative_humidity=0.95),
    ...     sequence.WithHeat(4_000.0),
    ... ]
    >>> found = sequence.solve(
    ...     AirStream(air, dry_air_flow=2.0), steps,
    ...     free=(0, "leaving_temperature"), low=5.0, high=20.0, wanted="humidity_ratio", value=0.0085,
    ... )
    >>> found.how.name, round(found.number, 2)
    ('SOLVED', 12.31)
    """
    kinds, arguments = _chain(entering, steps)
    if len(kinds) > MAX_STEPS:
        raise ValueError(f"steps may be at most {MAX_STEPS}, not {len(kinds)}")
    step, number = free
    last = len(kinds) - 1 if after is None else after
    chain = step, _quantity(number, "free"), last, _quantity(wanted, "wanted")
    for label, place in (("free", step), ("after", last)):
        if not 0 <= place < len(kinds):
            raise ValueError(f"{label} names step {place} of {len(kinds)}")
    arguments = [("low", low), ("high", high), ("value", value), *arguments]
    found, *done, total = run_sequence(kinds, [_Found, *[StepResult] * len(kinds), Total], arguments, chain)
    made: Solved[Any] = object.__new__(Solved)
    made.__dict__.update(found.__dict__, steps=tuple(done), total=total)
    return made


def _quantity(name: str, label: str) -> int:
    if name not in QUANTITIES:
        raise ValueError(f"{label} must be the name of a quantity, see moistair.QUANTITIES; not {name!r}")
    return QUANTITIES[name].code
