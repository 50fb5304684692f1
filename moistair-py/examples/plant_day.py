"""A day of an air handler and its cooling tower from a log of one-minute readings.

States, loads, water, what coil and tower should have done, and how far all of it can be trusted. It prints the same bytes as
``moistair-core/examples/plant_day.rs``::

    python moistair-py/examples/plant_day.py moistair-core/examples/plant_day.csv

The program reads, calls the library, and prints.
"""

from __future__ import annotations

import sys
from collections import defaultdict
from collections.abc import Iterable, Iterator, Sequence
from dataclasses import dataclass, field
from pathlib import Path
from typing import Any, Callable, Optional

import numpy as np
from moistair import MoistAir, MoistAirError
from moistair.account import Added, BooksTotal, Counts, Deviation, Period, Periods, Rule, Total
from moistair.process import AirStream, books, coil, humidify, mixing, room, sensible, tower
from moistair.process.economizer import Economizer, EconomizerRule, EconomizerState
from moistair.process.measured import MeasuredAir, Reading
from moistair.signal import Channel, ChannelState, CheckedColumns, Kind, Quality, Reason, Unit, from_core
from numpy.typing import NDArray

Array = NDArray[np.float64]
NAN = float("nan")

# ---- What is known of the plant ----

LOG = Path(__file__).parents[2].joinpath("moistair-core", "examples", "plant_day.csv")
# Times in s.
INTERVAL, LONGEST_STEP, HOLD, HOUR, DAY = 60.0, 90.0, 300.0, 3_600.0, 86_400.0
# Humidity ratios before and behind the coil that differ by less make no condensate, kg/kg.
DEAD_BAND = 0.0003
# Steam comes saturated at about atmospheric pressure, °C.
STEAM_TEMPERATURE = 100.0
TREATMENT = {"drift_fraction": 0.0001, "cycles_of_concentration": 4.0}
# At this elevation, Pa.
PRESSURE = 98_500.0
# The coil on the day when it was handed over: what entered it, and how cold the air left.
COMMISSIONED_AIR = MoistAir(dry_bulb=27.0, relative_humidity=0.5, pressure=PRESSURE)
COMMISSIONED_AIR_FLOW, COMMISSIONED_WATER_FLOW = 5.8, 6.0
SURFACE = coil.surface_from_rating(
    AirStream(COMMISSIONED_AIR, dry_air_flow=COMMISSIONED_AIR_FLOW),
    water_flow=COMMISSIONED_WATER_FLOW,
    entering_water=7.0,
    measured="leaving_air",
    value=11.1,
    # Water side over air side, from the data sheet.
    conductance_ratio=2.2,
)
FLOW_EXPONENTS = {"air_side_exponent": 0.6, "water_side_exponent": 0.8}
# The fill of the tower as its maker tested it, evaluated by Merkel's method: Merkel number at L/G = 1, and exponent.
FILL = {"coefficient": 1.12, "exponent": 0.6}
# Standard uncertainties of thermometers, K, hygrometers, and flows of dry air, kg/s.
THERMOMETER, HYGROMETER, AIR_FLOW = 0.2, 0.01, 0.05
# That of a share of outdoor air up to which it says something.
ACCEPTABLE = 0.05
# What the coil is to make of any air, °C and relative humidity.
OFF_COIL, OFF_COIL_HUMIDITY = 10.0, 0.97
ECONOMIZER = Economizer(
    rule=EconomizerRule.LEAST_COIL_ENERGY,
    pressure=PRESSURE,
    supply_temperature=OFF_COIL,
    coil_leaving_humidity=OFF_COIL_HUMIDITY,
)
# The moisture of the rooms comes from people, as vapor of this temperature, °C.
PEOPLE = 32.0


def temperature(minimum: float, maximum: float) -> Channel:
    return Channel(
        kind=Kind.TEMPERATURE, unit=Unit.CELSIUS, minimum=minimum, maximum=maximum, interval=INTERVAL, hold=HOLD
    )


def humidity() -> Channel:
    # Below the last digit of the log, so that any change counts; a living humidity moves within half an hour.
    return Channel(
        kind=Kind.RELATIVE_HUMIDITY,
        unit=Unit.PERCENT,
        minimum=0.0,
        maximum=1.0,
        interval=INTERVAL,
        hold=HOLD,
        stuck_samples=30,
        stuck_resolution=0.0004,
    )


def flow(kind: Kind, unit: Unit, maximum: float) -> Channel:
    return Channel(kind=kind, unit=unit, minimum=0.0, maximum=maximum, interval=INTERVAL)


def air_flow(maximum: float) -> Channel:
    return flow(Kind.VOLUME_FLOW, Unit.CUBIC_METER_PER_HOUR, maximum)


BAROMETER = Channel(
    kind=Kind.PRESSURE, unit=Unit.HECTOPASCAL, minimum=93_000.0, maximum=104_000.0, interval=INTERVAL, hold=HOUR
)
VALVE = Channel(
    kind=Kind.FRACTION, unit=Unit.PERCENT, minimum=0.0, maximum=1.0, interval=INTERVAL, slip_samples=0
)

# The columns of the log after the time: key, name, limits in the unit of the library.
CHANNELS: list[tuple[str, str, Channel]] = [
    ("pressure", "barometer", BAROMETER),
    ("outdoor", "outdoor air", temperature(-25.0, 45.0)),
    ("outdoor_rh", "outdoor air", humidity()),
    ("mixed", "mixed air", temperature(0.0, 45.0)),
    ("mixed_rh", "mixed air", humidity()),
    ("coil", "air off the coil", temperature(0.0, 45.0)),
    ("coil_rh", "air off the coil", humidity()),
    ("heater", "air off the heater", temperature(0.0, 60.0)),
    ("supply", "supply air", temperature(0.0, 60.0)),
    ("supply_rh", "supply air", humidity()),
    ("return", "return air", temperature(0.0, 45.0)),
    ("return_rh", "return air", humidity()),
    ("supply_flow", "supply air", air_flow(8.0)),
    ("outdoor_flow", "outdoor air", air_flow(4.0)),
    ("valve", "coil valve", VALVE),
    ("steam", "steam", flow(Kind.MASS_FLOW, Unit.KILOGRAM_PER_HOUR, 0.03)),
    ("tower_water", "tower water", flow(Kind.MASS_FLOW, Unit.KILOGRAM_PER_SECOND, 12.0)),
    ("tower_hot", "tower water, hot", temperature(0.0, 60.0)),
    ("tower_cold", "tower water, cold", temperature(0.0, 60.0)),
    ("tower_air", "tower air", air_flow(12.0)),
    ("chilled_water", "chilled water", flow(Kind.MASS_FLOW, Unit.KILOGRAM_PER_SECOND, 12.0)),
    ("chilled_supply", "chilled water supply", temperature(0.0, 40.0)),
    ("chilled_return", "chilled water return", temperature(0.0, 40.0)),
]

COLUMNS = ("time", *(key for key, _, _ in CHANNELS))

PROCESSES = (
    "mixing",
    "cooling coil",
    "fan and heater",
    "humidifier",
    "cooling tower",
    "coil, predicted",
    "tower, predicted",
)

# Where a measured value stands beside a computed one; a difference in °C is one in K.
CHECKS = {
    "mixed": ("mixed air, dry bulb", "K", Unit.CELSIUS),
    "mixed_ratio": ("mixed air, humidity ratio", "g/kg", Unit.GRAM_PER_KILOGRAM),
    "supply": ("supply air, dry bulb", "K", Unit.CELSIUS),
    "supply_ratio": ("supply air, humidity ratio", "g/kg", Unit.GRAM_PER_KILOGRAM),
    "coil": ("off coil, dry bulb", "K", Unit.CELSIUS),
    "coil_ratio": ("off coil, humidity ratio", "g/kg", Unit.GRAM_PER_KILOGRAM),
    "coil_load": ("coil load", "kW", Unit.KILOWATT),
    "merkel_number": ("tower, Merkel number", "1", Unit.FRACTION),
    "cold_water": ("tower, cold water", "K", Unit.CELSIUS),
}

# The channels that a result rests on: it can be trusted as far as the worst of them.
SUPPLY_STREAM = ("pressure", "supply", "supply_rh", "supply_flow")
ON_COIL = (*SUPPLY_STREAM, "mixed", "mixed_rh", "coil", "coil_rh")
ON_HEATER = (*ON_COIL, "heater")
ON_REHEAT = (*ON_HEATER, "valve")
AIR_FLOWS = (*SUPPLY_STREAM, "outdoor", "outdoor_rh", "outdoor_flow")
ON_ECONOMIZER = ("outdoor", "outdoor_rh", "return", "return_rh", "chilled_water")
ON_ROOMS = (*SUPPLY_STREAM, "return", "return_rh")
TOWER_INLETS = ("pressure", "outdoor", "outdoor_rh", "tower_water", "tower_hot", "tower_air")
ON_TOWER = (*TOWER_INLETS, "tower_cold")
COIL_INLETS = (*SUPPLY_STREAM, "mixed", "mixed_rh", "chilled_water", "chilled_supply")
COIL_SIDES = (*ON_COIL, "chilled_water", "chilled_supply", "chilled_return")

# ---- The readings of an hour ----


@dataclass
class Checks:
    """How well the books close, and how far measured and computed states lie apart."""

    books: dict[str, BooksTotal] = field(default_factory=lambda: {name: BooksTotal() for name in PROCESSES})
    deviations: dict[str, Deviation] = field(default_factory=lambda: {name: Deviation() for name in CHECKS})

    def merge(self, other: Checks) -> None:
        for name in PROCESSES:
            self.books[name].merge(other.books[name])
        for name in CHECKS:
            self.deviations[name].merge(other.deviations[name])

    def record(self, process: str, entering: Sequence[Any], done: Any) -> None:
        """Adds the books of a process; a row without a result counts as refused."""
        self.books[process].record(books.balance(entering, leaving=done.leaving, exchange=done.exchange))

    def compare(self, name: str, measured: MoistAir[Any], dry_bulb: Array, humidity_ratio: Array) -> None:
        """Adds a measured state beside what was computed of it."""
        self.deviations[name].add(measured=measured.dry_bulb, computed=dry_bulb)
        self.deviations[f"{name}_ratio"].add(measured=measured.humidity_ratio, computed=humidity_ratio)


class Rows:
    """Consecutive rows of the log: checked readings, and the rates that come of them."""

    def __init__(self, readings: dict[str, CheckedColumns], rows: slice) -> None:
        self.values: dict[str, Array] = {name: column.value[rows] for name, column in readings.items()}
        self.qualities: dict[str, Any] = {name: column.quality[rows] for name, column in readings.items()}
        self.rates: dict[str, tuple[Array, Any]] = {}
        self.checks = Checks()

    def set(self, rate: str, value: Array, channels: Iterable[str]) -> None:
        self.rates[rate] = (value, np.maximum.reduce([self.qualities[channel] for channel in channels]))

    def state(self, name: str) -> MoistAir[Any]:
        humidity = f"{name}_rh"
        air = MoistAir(
            dry_bulb=self.values[name],
            relative_humidity_over_liquid=self.values[humidity],
            pressure=self.values["pressure"],
        )
        channels = ("pressure", name, humidity)
        self.set(f"{name}_ratio", air.humidity_ratio, channels)
        self.set(f"{name}_enthalpy", air.specific_enthalpy, channels)
        return air

    def reading(self, name: str, uncertainty: float) -> Reading:
        return Reading(self.values[name], standard_uncertainty=uncertainty, quality=self.qualities[name])

    def measured_air(self, name: str) -> MeasuredAir:
        humidity = self.reading(f"{name}_rh", HYGROMETER)
        return MeasuredAir(dry_bulb=self.reading(name, THERMOMETER), relative_humidity=humidity)

    def evaluate(self, time: Array, economizer: EconomizerState) -> None:
        """The whole plant."""
        value, checks = self.values, self.checks
        for name in value:
            self.set(name, value[name], (name,))
        outdoor, supply, returned = self.state("outdoor"), self.state("supply"), self.state("return")
        mixed, off_coil = self.state("mixed"), self.state("coil")
        outdoor_air = AirStream.from_volume_flow(outdoor, volume_flow=value["outdoor_flow"])
        supply_air = AirStream.from_volume_flow(supply, volume_flow=value["supply_flow"])
        total = supply_air.dry_air_flow
        self.set("supply_air", total, SUPPLY_STREAM)
        self.set("outdoor_air", outdoor_air.dry_air_flow, ("pressure", "outdoor", "outdoor_rh", "outdoor_flow"))

        self.compare_outdoor_air(outdoor_air, supply_air)
        self.decide(time, economizer)
        # What the rooms, and all that stores heat and water in them, give to the air.
        gains = room.gains_between(supply_air, room=returned, source_value=PEOPLE)
        self.set("room_sensible", gains.sensible, ON_ROOMS)
        self.set("room_moisture", gains.moisture, ON_ROOMS)

        # Outdoor and recirculated air as the flows say, beside the state measured behind the mixing box.
        recirculated = mixing.remainder(total_flow=total, part=outdoor_air, air=returned)
        mixture = mixing.adiabatic(outdoor_air, recirculated)
        checks.record("mixing", [outdoor_air, recirculated], mixture)
        air = mixture.leaving.air.air
        checks.compare("mixed", mixed, air.dry_bulb, air.humidity_ratio)

        # The cooling coil between the two measured states.
        entering = AirStream(mixed, dry_air_flow=total)
        cooling = coil.between(entering, leaving=off_coil, dead_band=DEAD_BAND)
        checks.record("cooling coil", [cooling.entering], cooling)
        self.set("sensible", cooling.sensible, ON_COIL)
        self.set("latent", cooling.latent, ON_COIL)
        self.set("cooling", cooling.cooling_load, ON_COIL)
        self.set("condensate", cooling.condensate, ON_COIL)
        self.meter_the_water(entering, cooling.cooling_load)
        self.predict_coil(entering, off_coil, cooling.cooling_load)

        # Fan and heater, up to the temperature measured behind them. Heat counts as reheat while the valve is open.
        heating = sensible.to_temperature(cooling.leaving, leaving_temperature=value["heater"])
        checks.record("fan and heater", [cooling.leaving], heating)
        heat = heating.exchange.heat
        self.set("heating", heat, ON_HEATER)
        closed = np.where(np.isnan(heat), heat, 0.0)
        self.set("reheat", np.where(value["valve"] > 0.0, heat, closed), ON_REHEAT)

        # The metered steam, beside the state measured in the supply air.
        enthalpy = humidify.saturated_steam_enthalpy(steam_temperature=STEAM_TEMPERATURE)
        humidified = humidify.steam(heating.leaving, steam_flow=value["steam"], steam_enthalpy=enthalpy)
        checks.record("humidifier", [heating.leaving], humidified)
        air = humidified.leaving.air.air
        checks.compare("supply", supply, air.dry_bulb, air.humidity_ratio)

        # The cooling tower on outdoor air.
        tower_air = AirStream.from_volume_flow(outdoor, volume_flow=value["tower_air"])
        water = value["tower_water"]
        cooler = tower.with_air_flow(
            tower_air, water_flow=water, hot_water=value["tower_hot"], cold_water=value["tower_cold"], **TREATMENT
        )
        checks.record("cooling tower", [tower_air], cooler)
        self.set("rejected", cooler.heat_rejected, ON_TOWER)
        self.set("evaporation", cooler.water.evaporation, ON_TOWER)
        self.set("drift", cooler.water.drift, ON_TOWER)
        self.set("blowdown", cooler.water.blowdown, ON_TOWER)
        self.set("make_up", cooler.water.make_up, ON_TOWER)
        self.set("range", np.where(water > 0.0, cooler.range, NAN), ON_TOWER)
        self.set("approach", np.where(water > 0.0, cooler.approach, NAN), ON_TOWER)
        self.predict_tower(tower_air)

    def compare_outdoor_air(self, outdoor: AirStream[Any], supply: AirStream[Any]) -> None:
        """The share of outdoor air in the supply air, by flows and by temperatures, where they are sure enough."""
        part, whole = (Reading(air.dry_air_flow, standard_uncertainty=AIR_FLOW) for air in (outdoor, supply))
        by_flows = mixing.outdoor_air_from_flows(outdoor=part, other=whole, acceptable=ACCEPTABLE)
        by_temperatures = mixing.outdoor_air_from_readings(
            quantity="dry_bulb",
            outdoor=self.reading("outdoor", THERMOMETER),
            returned=self.reading("return", THERMOMETER),
            mixed=self.reading("mixed", THERMOMETER),
            acceptable=ACCEPTABLE,
        )
        for name, found, channels in (
            ("share_by_flows", by_flows, AIR_FLOWS),
            ("share_by_temperatures", by_temperatures, ("outdoor", "return", "mixed")),
        ):
            determined = found.fraction_status == mixing.FractionStatus.DETERMINED
            self.set(name, np.where(determined, found.fraction, NAN), channels)

    def decide(self, time: Array, economizer: EconomizerState) -> None:
        """Whether the coil, while it works, would have had less to do with outdoor air than with return air: 1 or 0."""
        outdoor, returned = self.measured_air("outdoor"), self.measured_air("return")
        decision = ECONOMIZER.decide(economizer, time=time, outdoor=outdoor, returned=returned)
        flow = self.values["chilled_water"]
        cheaper = np.where(decision.enabled, np.where(flow > 0.0, 1.0, 0.0), 0.0)
        known = np.where(decision.quality != Quality.REFUSED, cheaper, NAN)
        self.set("outdoor_cheaper", np.where(np.isnan(flow), NAN, known), ON_ECONOMIZER)

    def meter_the_water(self, entering: AirStream[Any], load: Array) -> None:
        """The load of the coil by its water, beside that by its air."""
        flow, supply, back = (self.values[f"chilled_{name}"] for name in ("water", "supply", "return"))
        self.set("chilled_supply", np.where(flow > 0.0, supply, NAN), ("chilled_supply",))
        self.set("chilled_return", np.where(flow > 0.0, back, NAN), ("chilled_return",))
        found = coil.load_by_water(
            entering, load_by_air=load, water_flow=flow, entering_water=supply, leaving_water=back
        )
        self.set("load_by_water", found.load, COIL_SIDES)
        self.set("air_less_water", found.air_less_water, COIL_SIDES)

    def predict_coil(self, entering: AirStream[Any], measured: MoistAir[Any], load: Array) -> None:
        """What the coil should do with the air and the water that enter it, beside what it does."""
        flow = self.values["chilled_water"]
        surface = coil.surface_at_flows(
            air_side=SURFACE.air_side,
            water_side=SURFACE.water_side,
            found_at_air_flow=COMMISSIONED_AIR_FLOW,
            found_at_water_flow=COMMISSIONED_WATER_FLOW,
            air_flow=entering.dry_air_flow,
            water_flow=flow,
            **FLOW_EXPONENTS,
        )
        predicted = coil.with_water(
            entering,
            air_side=surface.air_side,
            water_side=surface.water_side,
            water_flow=flow,
            entering_water=self.values["chilled_supply"],
        ).air
        self.checks.record("coil, predicted", [entering], predicted)
        self.set("predicted_load", predicted.cooling_load, COIL_INLETS)
        air = predicted.leaving.air
        dry_bulb, ratio, cooling_load = (
            np.where(flow > 0.0, value, NAN) for value in (air.dry_bulb, air.humidity_ratio, predicted.cooling_load)
        )
        self.set("predicted_coil", dry_bulb, COIL_INLETS)
        self.set("predicted_coil_ratio", ratio, COIL_INLETS)
        self.checks.compare("coil", measured, dry_bulb, ratio)
        self.checks.deviations["coil_load"].add(measured=load, computed=cooling_load)

    def predict_tower(self, entering: AirStream[Any]) -> None:
        """What the tower should do with the air and the water that enter it, beside what it does; nothing while it rests."""
        flow, hot, cold = (self.values[f"tower_{name}"] for name in ("water", "hot", "cold"))
        water_to_air = tower.water_to_air_ratio(entering, water_flow=flow)
        law = tower.fill_number(water_to_air=water_to_air, **FILL)
        rated = tower.merkel_rate(entering, water_flow=flow, hot_water=hot, number=law)
        balance = tower.with_air_flow(
            entering, water_flow=flow, hot_water=hot, cold_water=rated.cold_water, **TREATMENT
        )
        self.checks.record("tower, predicted", [entering], balance)
        cools = np.isfinite(balance.heat_rejected)
        number, predicted = (np.where(cools, value, NAN) for value in (law, rated.cold_water))
        self.set("water_to_air", np.where(cools, water_to_air, NAN), TOWER_INLETS)
        self.set("merkel_number_by_law", number, TOWER_INLETS)
        self.set("predicted_cold_water", predicted, TOWER_INLETS)
        self.set("cold_water", np.where(cools, cold, NAN), ("tower_cold",))
        self.checks.deviations["cold_water"].add(measured=cold, computed=predicted)
        found = tower.merkel_number(entering, water_flow=flow, hot_water=hot, cold_water=cold).number
        self.set("merkel_number", np.where(cools, found, NAN), ON_TOWER)
        self.checks.deviations["merkel_number"].add(measured=found, computed=number)


# ---- The log ----


@dataclass
class Span:
    """An hour, or the day."""

    start: float
    length: float
    totals: dict[str, Total]
    checks: Checks

    def merge(self, other: Span) -> None:
        for rate, total in other.totals.items():
            self.totals[rate].merge(total)
        self.checks.merge(other.checks)


@dataclass
class Summary:
    """What the log holds."""

    rows: int
    not_in_time: int
    unreadable: int
    # One for every row: what the rows cover.
    log: Total
    counts: list[Counts]
    hours: list[Span]
    day: Span


def empty_total() -> Total:
    return Total(rule=Rule.STEP, longest_step=LONGEST_STEP)


def empty_periods() -> Periods:
    return Periods(length=HOUR, rule=Rule.STEP, longest_step=LONGEST_STEP)


def number(text: str) -> float:
    """A field that is no number is a missing reading."""
    try:
        return float(text)
    except ValueError:
        return NAN


def parse(line: str) -> list[float]:
    return [number(text) for text in line.rstrip().split(",")]


def read(path: Path) -> Summary:
    with open(path, encoding="utf-8", newline="\n") as file:
        lines = [parse(line) for line in file][1:]
    rows = [line for line in lines if len(line) == len(COLUMNS)]
    table = np.array(rows).reshape(len(rows), len(COLUMNS)).T
    log = empty_total()
    in_time = log.add(time=table[0], rate=1.0) != Added.TIME_REFUSED
    time, *raw = table[:, in_time]

    readings: dict[str, CheckedColumns] = {}
    counts = [Counts() for _ in CHANNELS]
    for (key, _, channel), column, count in zip(CHANNELS, raw, counts):
        readings[key] = channel.check(ChannelState(), time=time, raw=column)
        count.record(readings[key])

    hours = list(spans(time, readings))
    day = Span(0.0, DAY, defaultdict(empty_total), Checks())
    for hour in hours:
        day.merge(hour)
    not_in_time = int(np.count_nonzero(~in_time))
    unreadable = len([line for line in lines if len(line) != len(COLUMNS)])
    return Summary(len(lines), not_in_time, unreadable, log, counts, hours, day)


def spans(time: Array, readings: dict[str, CheckedColumns]) -> Iterator[Span]:
    """Evaluates the log hour by hour."""
    clock = empty_periods()
    starts = [row for row, instant in enumerate(time.tolist()) if clock.add(time=instant, rate=1.0)]
    edges = [0, *starts, len(time)]
    periods: dict[str, Periods] = defaultdict(empty_periods)
    checks, economizer = Checks(), EconomizerState()
    for start, end in zip(edges, edges[1:]):
        rows = Rows(readings, slice(start, end))
        rows.evaluate(time[start:end], economizer)
        finished = {}
        for rate, (value, quality) in rows.rates.items():
            # The first row of an hour finishes the hour before.
            finished[rate] = periods[rate].add(time=time[start:end], rate=value, quality=quality)
        if all(finished.values()):
            yield span({rate: ended[0] for rate, ended in finished.items()}, checks)
        checks = rows.checks
    unfinished = {rate: running.unfinished for rate, running in periods.items()}
    begun = {rate: period for rate, period in unfinished.items() if period is not None}
    if begun:
        yield span(begun, checks)


def span(periods: dict[str, Period], checks: Checks) -> Span:
    totals = {rate: period.total for rate, period in periods.items()}
    return Span(periods["pressure"].start, HOUR, totals, checks)


# ---- The tables ----

TITLE = """\
Air handler and cooling tower: a day of one-minute readings

"""

LOG_NOTE = """\

Sums and means stand for the covered time only and are not extrapolated. cover: the share of the hour or of the
day for which every reading that the result needs was there and plausible. rep.: minutes of it with a reading
that was repaired, by the last good value or at saturation. Table 7 says what was refused, and why.
"""

AIR_HEAD = """\

1  Air: means of dry bulb, relative humidity over liquid water, humidity ratio, enthalpy; cover in %

    pressure  --------- outdoor air ----------  ---------- supply air ----------  ---------- return air ----------
hour     hPa      °C     %   g/kg  kJ/kg cover      °C     %   g/kg  kJ/kg cover      °C     %   g/kg  kJ/kg cover
"""

HANDLER_HEAD = """\

2  Air handler: dry air, means before and behind the coil, heat and water

     - dry air -  -- mixed --- - off coil -  valve ----- coil load ------ conden- fan and heater  steam  - cover - rep.
hour supply outd.                                  sensible latent  total    sate   heat reheat
       kg/s  kg/s     °C  g/kg     °C  g/kg     %      kWh    kWh    kWh     kg     kWh    kWh     kg  coil% heat%  min
"""

HANDLER_NOTE = (
    """\

Peaks in kW and kg/h. Condensate leaves at the temperature of the air off the coil; humidity ratios that differ by
less than """,
    """\
 g/kg make none. Cooling at a closed valve: the thermometers differ, or the valve passes. Reheat: the heat
of fan and heater while the coil valve is open.
""",
)

TOWER_HEAD = """\

3  Cooling tower: heat and water

        water  rejected   range  approach  evaporation   drift  blowdown   make-up    cover     rep.
hour     kg/s       kWh       K         K           kg      kg        kg        kg        %      min
"""

TOWER_NOTE = (
    """\

Peaks in kW, K and kg/h. Range and approach: while water flows. The leaving air is taken as saturated, which
over-predicts evaporation where it does not. Drift """,
    """\
 % of the water, """,
    """\
 cycles of concentration. Estimates: towers
and humidifiers can spread Legionella; hygiene rules and licensed practice govern, not these numbers.
""",
)

COIL_HEAD = """\

4  Equipment: predicted beside measured

      - chilled water --    --------- load of the coil ---------    ---- air off the coil -----  cover
hour  flow supply return    by air by water difference predicted      predicted      difference
      kg/s     °C     °C       kWh      kWh        kWh       kWh       °C  g/kg        K   g/kg      %
"""

TOWER_RATING_HEAD = """\

     water     - Merkel number -     -- cold water of the tower ---   cover
hour  /air    measured  fill law    measured  predicted  difference
         1           1         1          °C         °C           K       %
"""

EQUIPMENT_NOTE = (
    """\

Differences: the load by air less that by water, where both are there; else measured less predicted. Temperatures,
humidity ratios and Merkel numbers: while water flows. The coil: """,
    """\
 kW/K on the side of the air and """,
    """\
 kW/K on
that of the water explain the point at which it was handed over; they go with the powers """,
    """\
 and """,
    """\
 of the flows.
Air and water should agree on the load within some per cent, or a meter is off. The tower: Merkel number """,
    """\

(L/G)^-""",
    """\
 as the fill was tested, by Merkel's method. What falls short of the prediction asks for a look at the
meters first, then at flows, fouling and scale. A tower that scales or fouls is also a place where Legionella grows:
hygiene rules govern its cleaning.
""",
)

ROOMS_HEAD = """\

5  Outdoor air and rooms

      ---- share of outdoor air ----    outdoor     --------- rooms ---------   cover
hour  by flows  by dry bulbs    sure    cheaper    sensible  moisture   ratio
             %             %       %        min         kWh        kg       1       %
"""

ROOMS_NOTE = (
    """\

Share of outdoor air in the dry air of the supply: by the flows, and by the dry bulbs of outdoor, return and mixed air
for as much of the time as thermometers good to """,
    """\
 K make sure of it to """,
    """\
 %. Outdoor cheaper: while the coil works,
to bring outdoor air to """,
    """\
 °C would have cost it less than return air. Rooms: what they give to the air, with what
walls and paper store; moisture as vapor of """,
    """\
 °C. Ratio: sensible to all heat, by the means; where the two cancel it
says nothing. How much outdoor air people need is a matter of ventilation codes.
""",
)

CHECKS_HEAD = """\

6  Checks: means of measured less computed; books of heat and water of all processes

     -- mixed air -- --- supply air -- ------ books ----- largest residual
hour        K    g/kg         K    g/kg  computed  closed     heat   water
"""

DEVIATIONS_HEAD = """\

measured less computed      unit  samples     mean      rms   lowest  highest
"""

BOOKS_HEAD = """\

books                   computed  closed  no result  largest residual: heat   water
"""

CHECKS_NOTE = """\

Mixed air is computed from the flows and states of outdoor and return air, supply air from the air off the heater
and the metered steam. Residuals are in units of 2^-52 of the terms of a book; a book is closed within 8 of them
and what the last bit of the temperatures is worth. No result: a reading was refused, no process does
that, or the tower to predict was at rest.
"""

CHANNELS_HEAD = """\

7  Readings

channel              unit     good repaired refused gaps  why
"""


# A value, its width, its decimals.
Cell = tuple[Optional[float], int, int]


def text(value: Optional[float], width: int, decimals: int) -> str:
    """ "-" where there is no value, and no minus before zero."""
    if value is None or not np.isfinite(value):
        return "-".rjust(width)
    shown = f"{value:.{decimals}f}"
    return (shown if set("123456789").intersection(shown) else shown.lstrip("-")).rjust(width)


def shown(value: Optional[float], unit: Unit) -> Optional[float]:
    return None if value is None else float(from_core(value, unit=unit))


def print_row(label: str, cells: Iterable[Cell]) -> None:
    print(label.ljust(4), *(text(*cell) for cell in cells), sep="")


def print_hours(summary: Summary, cells: Callable[[Span], list[Cell]]) -> None:
    """A table with a row for each hour and one for the day."""
    for hour in summary.hours:
        print_row(f"{from_core(hour.start, unit=Unit.HOUR):02.0f}", cells(hour))
    print_row("day", cells(summary.day))


def mean(span: Span, rate: str, unit: Unit) -> Optional[float]:
    return shown(span.totals[rate].mean, unit)


def highest(span: Span, rate: str, unit: Unit) -> Optional[float]:
    return shown(span.totals[rate].highest, unit)


def total(span: Span, rate: str) -> Optional[float]:
    """In the unit of the rate times s."""
    return span.totals[rate].total if span.totals[rate].covered_seconds > 0.0 else None


def kilowatt_hours(span: Span, rate: str) -> Optional[float]:
    return shown(total(span, rate), Unit.KILOWATT_HOUR)


def cover(span: Span, rate: str) -> Optional[float]:
    return shown(span.totals[rate].coverage_of(span.length), Unit.PERCENT)


def repaired(span: Span, rate: str) -> Optional[float]:
    return shown(span.totals[rate].repaired_seconds, Unit.MINUTE)


def air_cells(span: Span) -> list[Cell]:
    cells: list[Cell] = [(mean(span, "pressure", Unit.HECTOPASCAL), 8, 1)]
    for name in ("outdoor", "supply", "return"):
        cells.append((mean(span, name, Unit.CELSIUS), 8, 1))
        cells.append((mean(span, f"{name}_rh", Unit.PERCENT), 6, 1))
        cells.append((mean(span, f"{name}_ratio", Unit.GRAM_PER_KILOGRAM), 7, 2))
        cells.append((mean(span, f"{name}_enthalpy", Unit.KILOJOULE_PER_KILOGRAM), 7, 1))
        cells.append((cover(span, f"{name}_ratio"), 6, 1))
    return cells


def handler_cells(span: Span) -> list[Cell]:
    return [
        (mean(span, "supply_air", Unit.KILOGRAM_PER_SECOND), 7, 2),
        (mean(span, "outdoor_air", Unit.KILOGRAM_PER_SECOND), 6, 2),
        (mean(span, "mixed", Unit.CELSIUS), 7, 1),
        (mean(span, "mixed_ratio", Unit.GRAM_PER_KILOGRAM), 6, 2),
        (mean(span, "coil", Unit.CELSIUS), 7, 1),
        (mean(span, "coil_ratio", Unit.GRAM_PER_KILOGRAM), 6, 2),
        (mean(span, "valve", Unit.PERCENT), 6, 1),
        (kilowatt_hours(span, "sensible"), 9, 1),
        (kilowatt_hours(span, "latent"), 7, 1),
        (kilowatt_hours(span, "cooling"), 7, 1),
        (total(span, "condensate"), 7, 1),
        (kilowatt_hours(span, "heating"), 8, 1),
        (kilowatt_hours(span, "reheat"), 7, 1),
        (total(span, "steam"), 7, 1),
        (cover(span, "cooling"), 7, 1),
        (cover(span, "heating"), 6, 1),
        (repaired(span, "heating"), 5, 0),
    ]


def handler_peaks(day: Span) -> list[Cell]:
    return [
        (highest(day, "sensible", Unit.KILOWATT), 54, 1),
        (highest(day, "latent", Unit.KILOWATT), 7, 1),
        (highest(day, "cooling", Unit.KILOWATT), 7, 1),
        (highest(day, "condensate", Unit.KILOGRAM_PER_HOUR), 7, 1),
        (highest(day, "heating", Unit.KILOWATT), 8, 1),
        (highest(day, "reheat", Unit.KILOWATT), 7, 1),
        (highest(day, "steam", Unit.KILOGRAM_PER_HOUR), 7, 1),
    ]


def tower_cells(span: Span) -> list[Cell]:
    return [
        (mean(span, "tower_water", Unit.KILOGRAM_PER_SECOND), 9, 2),
        (kilowatt_hours(span, "rejected"), 10, 1),
        (mean(span, "range", Unit.CELSIUS), 8, 2),
        (mean(span, "approach", Unit.CELSIUS), 10, 2),
        (total(span, "evaporation"), 13, 1),
        (total(span, "drift"), 8, 2),
        (total(span, "blowdown"), 10, 1),
        (total(span, "make_up"), 10, 1),
        (cover(span, "rejected"), 9, 1),
        (repaired(span, "rejected"), 9, 0),
    ]


def tower_peaks(day: Span) -> list[Cell]:
    return [
        (highest(day, "rejected", Unit.KILOWATT), 19, 1),
        (highest(day, "range", Unit.CELSIUS), 8, 2),
        (highest(day, "approach", Unit.CELSIUS), 10, 2),
        (highest(day, "evaporation", Unit.KILOGRAM_PER_HOUR), 13, 1),
        (highest(day, "drift", Unit.KILOGRAM_PER_HOUR), 8, 2),
        (highest(day, "blowdown", Unit.KILOGRAM_PER_HOUR), 10, 1),
        (highest(day, "make_up", Unit.KILOGRAM_PER_HOUR), 10, 1),
    ]


def sensible_heat_ratio(span: Span) -> Optional[float]:
    """Of the means of a span: of minutes in which hardly any heat comes in it says nothing."""
    means = [span.totals[rate].mean for rate in ("return", "return_ratio", "pressure", "room_sensible", "room_moisture")]
    dry_bulb, ratio, pressure, sensible_gain, moisture = (NAN if value is None else value for value in means)
    try:
        air = MoistAir(dry_bulb=dry_bulb, humidity_ratio=ratio, pressure=pressure)
        return room.sensible_heat_ratio(air, sensible=sensible_gain, moisture=moisture, source_value=PEOPLE)
    except MoistAirError:
        return None


def room_cells(span: Span) -> list[Cell]:
    return [
        (mean(span, "share_by_flows", Unit.PERCENT), 10, 1),
        (mean(span, "share_by_temperatures", Unit.PERCENT), 14, 1),
        (cover(span, "share_by_temperatures"), 8, 1),
        (shown(total(span, "outdoor_cheaper"), Unit.MINUTE), 11, 0),
        (kilowatt_hours(span, "room_sensible"), 12, 1),
        (total(span, "room_moisture"), 10, 1),
        (sensible_heat_ratio(span), 8, 2),
        (cover(span, "room_sensible"), 8, 1),
    ]


def deviation(span: Span, check: str) -> Optional[float]:
    return shown(span.checks.deviations[check].mean, CHECKS[check][2])


def coil_cells(span: Span) -> list[Cell]:
    return [
        (mean(span, "chilled_water", Unit.KILOGRAM_PER_SECOND), 6, 2),
        (mean(span, "chilled_supply", Unit.CELSIUS), 7, 1),
        (mean(span, "chilled_return", Unit.CELSIUS), 7, 1),
        (kilowatt_hours(span, "cooling"), 10, 1),
        (kilowatt_hours(span, "load_by_water"), 9, 1),
        (kilowatt_hours(span, "air_less_water"), 11, 1),
        (kilowatt_hours(span, "predicted_load"), 10, 1),
        (mean(span, "predicted_coil", Unit.CELSIUS), 9, 1),
        (mean(span, "predicted_coil_ratio", Unit.GRAM_PER_KILOGRAM), 6, 2),
        (deviation(span, "coil"), 9, 2),
        (deviation(span, "coil_ratio"), 7, 2),
        (cover(span, "predicted_load"), 7, 1),
    ]


def tower_rating_cells(span: Span) -> list[Cell]:
    return [
        (mean(span, "water_to_air", Unit.FRACTION), 6, 2),
        (mean(span, "merkel_number", Unit.FRACTION), 12, 2),
        (mean(span, "merkel_number_by_law", Unit.FRACTION), 10, 2),
        (mean(span, "cold_water", Unit.CELSIUS), 12, 1),
        (mean(span, "predicted_cold_water", Unit.CELSIUS), 11, 1),
        (deviation(span, "cold_water"), 12, 2),
        (cover(span, "predicted_cold_water"), 8, 1),
    ]


def check_cells(span: Span) -> list[Cell]:
    all_books = BooksTotal()
    for name in PROCESSES:
        all_books.merge(span.checks.books[name])
    return [
        (deviation(span, "mixed"), 9, 2),
        (deviation(span, "mixed_ratio"), 8, 3),
        (deviation(span, "supply"), 10, 2),
        (deviation(span, "supply_ratio"), 8, 3),
        (all_books.heat.samples, 10, 0),
        (all_books.closed, 8, 0),
        (all_books.heat.largest_in_epsilons, 9, 2),
        (all_books.water.largest_in_epsilons, 8, 2),
    ]


def print_log(summary: Summary) -> None:
    covered = shown(summary.log.coverage_of(DAY), Unit.PERCENT)
    print(TITLE, end="")
    print(f"rows read          {summary.rows:>6}")
    print(f"time not increasing{summary.not_in_time:>6}  ignored")
    print(f"not a row          {summary.unreadable:>6}  ignored")
    print(f"day covered by rows{text(covered, 6, 1)}  %")
    print(LOG_NOTE, end="")


def print_air(summary: Summary) -> None:
    print(AIR_HEAD, end="")
    print_hours(summary, air_cells)


def print_handler(summary: Summary) -> None:
    print(HANDLER_HEAD, end="")
    print_hours(summary, handler_cells)
    print_row("peak", handler_peaks(summary.day))
    print(HANDLER_NOTE[0], text(shown(DEAD_BAND, Unit.GRAM_PER_KILOGRAM), 0, 1), HANDLER_NOTE[1], sep="", end="")


def print_tower(summary: Summary) -> None:
    print(TOWER_HEAD, end="")
    print_hours(summary, tower_cells)
    print_row("peak", tower_peaks(summary.day))
    drift = text(shown(TREATMENT["drift_fraction"], Unit.PERCENT), 0, 2)
    cycles = text(TREATMENT["cycles_of_concentration"], 0, 1)
    print(TOWER_NOTE[0], drift, TOWER_NOTE[1], cycles, TOWER_NOTE[2], sep="", end="")


def print_equipment(summary: Summary) -> None:
    print(COIL_HEAD, end="")
    print_hours(summary, coil_cells)
    print(TOWER_RATING_HEAD, end="")
    print_hours(summary, tower_rating_cells)
    values = (
        text(shown(SURFACE.air_side, Unit.KILOWATT), 0, 1),
        text(shown(SURFACE.water_side, Unit.KILOWATT), 0, 1),
        *(text(exponent, 0, 1) for exponent in FLOW_EXPONENTS.values()),
        text(FILL["coefficient"], 0, 2),
        text(FILL["exponent"], 0, 1),
    )
    print(EQUIPMENT_NOTE[0], end="")
    for value, words in zip(values, EQUIPMENT_NOTE[1:]):
        print(value, words, sep="", end="")


def print_rooms(summary: Summary) -> None:
    print(ROOMS_HEAD, end="")
    print_hours(summary, room_cells)
    values = (
        text(THERMOMETER, 0, 1),
        text(shown(ACCEPTABLE, Unit.PERCENT), 0, 0),
        text(OFF_COIL, 0, 0),
        text(PEOPLE, 0, 0),
    )
    print(ROOMS_NOTE[0], end="")
    for value, words in zip(values, ROOMS_NOTE[1:]):
        print(value, words, sep="", end="")


def print_checks(summary: Summary) -> None:
    print(CHECKS_HEAD, end="")
    print_hours(summary, check_cells)
    print(DEVIATIONS_HEAD, end="")
    for key, (name, unit, core) in CHECKS.items():
        found = summary.day.checks.deviations[key]
        values = (found.mean, found.root_mean_square, found.lowest, found.highest)
        cells = [text(shown(value, core), 9, 3) for value in values]
        print(f"{name:<28}{unit:<4}{found.samples:>9}", *cells, sep="")
    print(BOOKS_HEAD, end="")
    for name, total_books in summary.day.checks.books.items():
        heat, water = total_books.heat, total_books.water
        residuals = text(heat.largest_in_epsilons, 24, 2), text(water.largest_in_epsilons, 8, 2)
        print(f"{name:<20}{heat.samples:>12}{total_books.closed:>8}{heat.refused:>11}", *residuals, sep="")
    print(CHECKS_NOTE, end="")


def print_channels(summary: Summary) -> None:
    print(CHANNELS_HEAD, end="")
    for (_, name, channel), counts in zip(CHANNELS, summary.counts):
        good, repaired, refused = (counts.quality(quality) for quality in Quality)
        print(f"{name:<20} {channel.unit.text:<5}{good:>8}{repaired:>9}{refused:>8}{counts.gaps:>5}", end="")
        indent = 0
        for count, words in reasons(counts):
            print(f"{'':{indent}}{count:>5} {words}")
            indent = 56
        if not indent:
            print()


def reasons(counts: Counts) -> Iterator[tuple[int, str]]:
    """Every reason that occurred, with its count."""
    for reason in Reason:
        if reason not in (Reason.OK, Reason.GAP, Reason.HELD) and counts.reason(reason):
            yield counts.reason(reason), reason.text
        if counts.held_because(reason):
            yield counts.held_because(reason), f"held: {reason.text}"


def main() -> None:
    summary = read(Path(sys.argv[1]) if sys.argv[1:] else LOG)
    print_log(summary)
    print_air(summary)
    print_handler(summary)
    print_tower(summary)
    print_equipment(summary)
    print_rooms(summary)
    print_checks(summary)
    print_channels(summary)


if __name__ == "__main__":
    sys.stdout.reconfigure(encoding="utf-8", newline="\n")  # type: ignore[union-attr]
    main()
