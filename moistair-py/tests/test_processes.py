"""Processes: one row and many, the books, choices, and objects."""

import dataclasses
import enum
import math
import pickle
import re
import typing

import moistair
import numpy as np
import pytest
from moistair import MoistAir
from moistair.process import (
    AirStream,
    AirWithCondensate,
    WetStream,
    books,
    coil,
    compression,
    desiccant,
    economizer,
    evaporative,
    humidify,
    liquid_water_enthalpy,
    mixing,
    reheat,
    room,
    sensible,
    tower,
)
from moistair.process.measured import MeasuredAir, Reading
from moistair._rows import Record
from support import FORMULATIONS, SEA_LEVEL, same_bits

RNG = np.random.default_rng(7)
ROWS = 12
STEAM = 2_691_070.0


def stream(t, rh, flow, **more):
    return AirStream(MoistAir(dry_bulb=t, relative_humidity=rh, pressure=SEA_LEVEL, **more), dry_air_flow=flow)


def state(t, rh, **more):
    return MoistAir(dry_bulb=t, relative_humidity=rh, pressure=SEA_LEVEL, **more)


WATER = {"hot_water": 35.0, "cold_water": 27.0, "drift_fraction": 1e-4, "cycles_of_concentration": 4.0}
CIRCULATING = {"circulating_flow": 0.5, "drift_fraction": 1e-4, "cycles_of_concentration": 3.0}

def reading(value, uncertainty):
    return Reading(value, standard_uncertainty=uncertainty)


def decision(t, rh):
    outdoor = MeasuredAir(dry_bulb=reading(t, 0.2), relative_humidity=reading(rh, 0.02))
    rule = economizer.EconomizerRule.FIXED_DRY_BULB
    # Without hysteresis and least times a decision stands by itself, wherever in the series.
    settings = economizer.Economizer(
        rule=rule,
        pressure=SEA_LEVEL,
        dry_bulb_limit=30.0,
        temperature_hysteresis=0.0,
        least_time_on=0.0,
        least_time_off=0.0,
    )
    return settings.decide(economizer.EconomizerState(), time=np.arange(np.size(t), dtype=float).reshape(np.shape(t)), outdoor=outdoor)


#: Each process as a function of three columns: dry bulb, relative humidity, and a share between 0 and 1.
CASES = {
    "stream": lambda t, rh, x: stream(t, rh, 1.0 + x),
    "stream.volume": lambda t, rh, x: AirStream.from_volume_flow(state(t, rh), volume_flow=1.0 + x),
    "stream.standard": lambda t, rh, x: AirStream.from_standard_volume_flow(
        state(t, rh), volume_flow=1.0 + x, reference_density=1.2
    ),
    "wet_air": lambda t, rh, x: AirWithCondensate(state(t, rh), liquid=x * 1e-3),
    "wet_stream": lambda t, rh, x: WetStream(state(t, rh), dry_air_flow=1.0 + x),
    "wet_air.equilibrium": lambda t, rh, x: AirWithCondensate.from_enthalpy_and_water(
        specific_enthalpy=state(t, rh).specific_enthalpy, total_water=0.02 + 0.01 * x, pressure=SEA_LEVEL
    ),
    "wet_air.at_temperature": lambda t, rh, x: AirWithCondensate.from_dry_bulb_and_water(
        dry_bulb=t, total_water=0.02 * (rh + x), pressure=SEA_LEVEL
    ),
    "compression.to_pressure": lambda t, rh, x: compression.to_pressure(
        stream(t, rh, 1.0), pressure=2e5 + 6e5 * x, leaving_temperature=t - 10.0
    ),
    "compression.wet": lambda t, rh, x: compression.to_pressure(
        compression.to_pressure(stream(t, rh, 1.0), pressure=8e5, leaving_temperature=5.0).leaving,
        pressure=SEA_LEVEL,
        leaving_temperature=20.0 * x,
    ),
    "liquid_water_enthalpy": lambda t, rh, x: liquid_water_enthalpy(water_temperature=t + 0.0 * rh, pressure=SEA_LEVEL + x),
    "sensible.to_temperature": lambda t, rh, x: sensible.to_temperature(stream(t, rh, 1.0), leaving_temperature=t + 10 * x),
    "sensible.with_heat": lambda t, rh, x: sensible.with_heat(stream(t, rh, 1.0 + x), heat=5e3 * x),
    "coil.to_state": lambda t, rh, x: coil.to_state(stream(t, rh, 1.0 + x), leaving=state(5.0, 0.9)),
    "coil.to_state.given": lambda t, rh, x: coil.to_state(
        stream(t, rh, 2.0), leaving=state(5.0, 0.9), condensate_temperature=3.0 + x
    ),
    "coil.by_bypass_factor": lambda t, rh, x: coil.by_bypass_factor(
        stream(t, rh, 2.0), apparatus_dew_point=6.0, bypass_factor=x, condensate_temperature="apparatus"
    ),
    "coil.apparatus_dew_point": lambda t, rh, x: coil.apparatus_dew_point(state(t, rh), leaving=state(12.0 + x, 0.95)),
    "coil.apparatus_dew_points": lambda t, rh, x: coil.apparatus_dew_points(state(t, rh), leaving=state(12.0 + x, 0.85)),
    "coil.bypass_factor_of_rows": lambda t, rh, x: coil.bypass_factor_of_rows(of_one_row=x + 0 * (t + rh), rows=4),
    "coil.with_water": lambda t, rh, x: coil.with_water(
        stream(t, rh, 2.0), air_side=6e3, water_side=1e4 * x, water_flow=1.0 + x, entering_water=6.0
    ),
    "coil.with_water.brine": lambda t, rh, x: coil.with_water(
        stream(t, rh, 2.0),
        air_side=6e3,
        water_side=1e4,
        water_flow=1.0,
        entering_water=-10.0 + 80.0 * x,
        specific_heat=3600.0,
        condensate_temperature="apparatus",
    ),
    "coil.surface_from_rating": lambda t, rh, x: coil.surface_from_rating(
        stream(t, rh, 2.0), water_flow=1.0 + x, entering_water=6.0, value=8.0, measured="leaving_water", conductance_ratio=2.0
    ),
    "coil.surface_at_flows": lambda t, rh, x: coil.surface_at_flows(
        air_side=6e3,
        water_side=1e4,
        found_at_air_flow=2.0,
        found_at_water_flow=1.0,
        air_flow=1.0 + x,
        water_flow=0.5 + rh,
        air_side_exponent=0.6 + 0.0 * t,
        water_side_exponent=0.8,
    ),
    "coil.load_by_water": lambda t, rh, x: coil.load_by_water(
        stream(t, rh, 2.0), load_by_air=2e4, water_flow=1.0, entering_water=6.0, leaving_water=10.0 + 5.0 * x
    ),
    "coil.between": lambda t, rh, x: coil.between(stream(t, rh, 2.0 + x), leaving=state(5.0, 0.9), dead_band=1e-4),
    "reheat.to_state": lambda t, rh, x: reheat.to_state(
        stream(t, rh, 2.0), target=state(18.0, 0.3), coil_leaving_relative_humidity=0.9 + 0.1 * x
    ),
    "reheat.with_coil": lambda t, rh, x: reheat.with_coil(
        stream(t, rh, 2.0), target=state(18.0, 0.5), coil_leaving=0.1 * x, characteristic="bypass", coldest=2.0
    ),
    "room.supply_at_temperature": lambda t, rh, x: room.supply_at_temperature(
        state(t, rh), sensible=5e3 + 5e3 * x, moisture=1e-3, source_value=32.0, supply_temperature=t - 8.0
    ),
    "room.supply_at_flow": lambda t, rh, x: room.supply_at_flow(
        state(t, rh), sensible=5e3, moisture=1e-3 * x, source_value=15.0, source="liquid", dry_air_flow=1.0
    ),
    "room.room_of_supply": lambda t, rh, x: room.room_of_supply(
        stream(t, rh, 1.0), sensible=5e3, moisture=1e-3 * x, source_value=2.55e6, source="enthalpy"
    ),
    "room.gains_between": lambda t, rh, x: room.gains_between(stream(t, rh, 1.0 + x), room=state(24.0, 0.5), source_value=32.0),
    "room.latent_heat": lambda t, rh, x: room.latent_heat(state(t, rh + 0.1 * x)),
    "room.sensible_heat_ratio": lambda t, rh, x: room.sensible_heat_ratio(
        state(t, rh), sensible=5e3, moisture=1e-2 * x, source_value=32.0
    ),
    "room.process_slope": lambda t, rh, x: room.process_slope(
        sensible=5e3 * rh, moisture=1e-3 + 1e-2 * x, source_value=t, pressure=SEA_LEVEL
    ),
    "room.slope_of_ratio": lambda t, rh, x: room.slope_of_ratio(state(t, rh), sensible_heat_ratio=x),
    "room.ratio_of_slope": lambda t, rh, x: room.ratio_of_slope(state(t, rh), slope=3e6 + 1e7 * x),
    "room.apparatus_dew_points": lambda t, rh, x: room.apparatus_dew_points(state(t, rh), sensible_heat_ratio=0.5 + 0.5 * x),
    "room.limiting_line": lambda t, rh, x: room.limiting_line(state(t, rh), entering=state(32.0, 0.5), coil_leaving=0.9 + 0.1 * x),
    "room.least_reheat": lambda t, rh, x: room.least_reheat(
        state(t, rh), sensible=8e3 * x, moisture=1.5e-3, source_value=32.0, entering=state(t, rh), coil_leaving=0.95
    ),
    "room.conditioned": lambda t, rh, x: room.conditioned(
        state(t, rh),
        sensible=3e3,
        moisture=2e-3,
        source_value=32.0,
        entering=stream(t + 5.0, rh, 0.5 + x),
        coil_leaving=0.05,
        characteristic="bypass",
        condensate_temperature="apparatus",
    ),
    "desiccant.to_humidity_ratio": lambda t, rh, x: desiccant.to_humidity_ratio(
        stream(t, rh, 1.0), target=0.002 + 0.004 * x, sorption_heat_ratio=1.1
    ),
    "desiccant.by_effectiveness": lambda t, rh, x: desiccant.by_effectiveness(
        stream(t, rh, 1.0), effectiveness=x, sorption_heat_ratio=1.1, carried=4.0, carry_over="rise"
    ),
    "desiccant.wheel": lambda t, rh, x: desiccant.wheel(
        stream(t, rh, 1.0),
        target=0.004 + 0.002 * x,
        sorption_heat_ratio=1.1,
        regeneration=stream(30.0, 0.4, 1.0),
        value=80.0 + 30.0 * x,
    ),
    "desiccant.potentials": lambda t, rh, x: desiccant.potentials(state(t, rh * (1.0 - 0.5 * x))),
    "desiccant.wheel_by_potentials": lambda t, rh, x: desiccant.wheel_by_potentials(
        stream(t, rh, 1.0), regeneration=stream(85.0, 0.03, 1.0), first_effectiveness=0.1 * x, second_effectiveness=0.9
    ),
    "desiccant.effectiveness_between": lambda t, rh, x: desiccant.effectiveness_between(
        state(t, rh), dried=state(60.0, 0.04 + 0.01 * x), regeneration=state(90.0, 0.03)
    ),
    "mixing.adiabatic": lambda t, rh, x: mixing.adiabatic(stream(t, rh, 1.0), stream(-10.0, 0.8, 0.1 + x), stream(5.0, 0.5, 1.0)),
    "mixing.adiabatic_at": lambda t, rh, x: mixing.adiabatic_at(
        stream(t, rh, 1.0), stream(-25.0, 0.8, 2.0 + x), pressure=100e3, freezing="supercooled"
    ),
    "mixing.remainder": lambda t, rh, x: mixing.remainder(total_flow=2.0, part=stream(t, rh, x), air=state(20.0, 0.5)),
    "mixing.outdoor_air_from_readings": lambda t, rh, x: mixing.outdoor_air_from_readings(
        quantity="dry_bulb", outdoor=reading(t, 0.2), returned=reading(24.0 + rh, 0.2), mixed=reading(20.0 + 10.0 * x, 0.2)
    ),
    "mixing.outdoor_air_from_air": lambda t, rh, x: mixing.outdoor_air_from_air(
        quantity="specific_enthalpy",
        outdoor=MeasuredAir(dry_bulb=reading(t, 0.2), relative_humidity=reading(rh, 0.02)),
        returned=MeasuredAir(dry_bulb=reading(24.0, 0.2), relative_humidity=reading(0.5, 0.02)),
        mixed=MeasuredAir(dry_bulb=reading(20.0 + 10.0 * x, 0.2), relative_humidity=reading(0.5, 0.02)),
        pressure=SEA_LEVEL,
    ),
    "mixing.outdoor_air_from_flows": lambda t, rh, x: mixing.outdoor_air_from_flows(
        outdoor=reading(x, 0.05), other=reading(1.0 + rh, 0.1), other_is="recirculated", acceptable=0.01 * t
    ),
    "mixing.outdoor_air_for_temperature": lambda t, rh, x: mixing.outdoor_air_for_temperature(
        outdoor=state(t, rh), returned=state(22.0, 0.5), wanted_temperature=20.0 + 10.0 * x, least=0.1
    ),
    "mixing.with_outdoor_air": lambda t, rh, x: mixing.with_outdoor_air(
        outdoor=state(t, rh), returned=state(-10.0, 0.8), fraction=x
    ),
    "economizer.coil_load": lambda t, rh, x: economizer.coil_load(state(t, rh), supply_temperature=8.0 + 12.0 * x),
    "economizer.enthalpy_limit": lambda t, rh, x: economizer.enthalpy_limit(pressure=9e4 + 1e3 * x + 0.0 * (t + rh)),
    "economizer.outdoor_air": lambda t, rh, x: decision(t, rh).outdoor_air(
        outdoor=state(t, rh), returned=state(24.0, 0.5), wanted_temperature=14.0 + 10.0 * x, least=0.2, most=0.9
    ),
    "humidify.saturated_steam_enthalpy": lambda t, rh, x: humidify.saturated_steam_enthalpy(
        steam_temperature=100.0 + x + 0 * (t + rh)
    ),
    "humidify.steam": lambda t, rh, x: humidify.steam(stream(t, rh, 1.0), steam_flow=0.02 * x, steam_enthalpy=STEAM),
    "humidify.steam_to_humidity_ratio": lambda t, rh, x: humidify.steam_to_humidity_ratio(
        stream(t, rh, 1.0), humidity_ratio=0.03 + 0.01 * x, steam_enthalpy=STEAM
    ),
    "humidify.steam_to_relative_humidity": lambda t, rh, x: humidify.steam_to_relative_humidity(
        stream(t, rh, 1.0), relative_humidity=0.9 + 0.1 * x, steam_enthalpy=STEAM
    ),
    "humidify.steam_limit": lambda t, rh, x: humidify.steam_limit(stream(t, rh, 1.0 + x), steam_enthalpy=STEAM),
    "humidify.spray": lambda t, rh, x: humidify.spray(stream(t, rh, 1.0), water_flow=0.01 * x, water_temperature=15.0),
    "humidify.evaporative": lambda t, rh, x: humidify.evaporative(stream(t, rh, 1.0), saturation_effectiveness=0.9 * x),
    "humidify.evaporative.given": lambda t, rh, x: humidify.evaporative(
        stream(t, rh, 1.0), saturation_effectiveness=0.5, water_temperature=10.0 + x
    ),
    "humidify.steam_absorption": lambda t, rh, x: humidify.steam_absorption(
        stream(t, rh, 1.0), steam_enthalpy=2.7e6 + 3e5 * x
    ),
    "humidify.saturated_steam": lambda t, rh, x: humidify.saturated_steam(steam_pressure=2e5 + 1e5 * x + 0 * (t + rh)),
    "humidify.wet_steam": lambda t, rh, x: humidify.wet_steam(steam_pressure=2e5 + 1e5 * x + 0 * t, quality=0.5 + rh / 2),
    "humidify.superheated_steam": lambda t, rh, x: humidify.superheated_steam(
        steam_temperature=170.0 + t + 0 * rh, steam_pressure=2e5 + 1e5 * x
    ),
    "humidify.throttled_steam": lambda t, rh, x: humidify.throttled_steam(
        steam_enthalpy=2.6e6 + 2e5 * x, pressure=1e5 + 1e3 * t + 0 * rh
    ),
    "humidify.wash": lambda t, rh, x: humidify.wash(
        stream(t, rh, 2.0), water_flow=2.0, water_temperature=8.0 + 10.0 * x, effectiveness=0.8, pump_heat=300.0
    ),
    "evaporative.direct": lambda t, rh, x: evaporative.direct(
        stream(t, rh, 1.0), saturation_effectiveness=0.1 + 0.9 * x, make_up_temperature=12.0, pump_heat=100.0, **CIRCULATING
    ),
    "evaporative.direct.plain": lambda t, rh, x: evaporative.direct(
        stream(t, rh, 1.0), saturation_effectiveness=0.1 + 0.9 * x, **CIRCULATING
    ),
    "evaporative.indirect": lambda t, rh, x: evaporative.indirect(
        stream(t, rh, 1.0), stream(t - 5.0, 0.4, 3.0), effectiveness=x, exhaust_humidity=1.0
    ),
    "evaporative.indirect.dew_point": lambda t, rh, x: evaporative.indirect(
        stream(t, rh, 1.0), stream(t, rh, 3.0), effectiveness=0.5 * x, effectiveness_of="dew_point", exhaust_humidity=1.0
    ),
    "evaporative.two_stage": lambda t, rh, x: evaporative.two_stage(
        stream(t, rh, 1.0), stream(t, rh, 3.0), effectiveness=x, exhaust_humidity=1.0, saturation_effectiveness=0.8, **CIRCULATING
    ),
    "tower.water_use": lambda t, rh, x: tower.water_use(
        evaporation=x + 0 * (t + rh), circulating_flow=20.0, drift_fraction=1e-4, cycles_of_concentration=4.0
    ),
    "tower.with_air_flow": lambda t, rh, x: tower.with_air_flow(stream(t, rh, 15.0), water_flow=10.0 + x, **WATER),
    "tower.with_leaving_air": lambda t, rh, x: tower.with_leaving_air(
        state(t, rh), leaving=state(45.0, 1.0), water_flow=10.0 + x, **WATER
    ),
    "tower.water_to_air_ratio": lambda t, rh, x: tower.water_to_air_ratio(stream(t, rh, 10.0), water_flow=10.0 + x),
    "tower.coldest_water": lambda t, rh, x: tower.coldest_water(state(t, rh + 0.1 * x)),
    "tower.merkel_pinch": lambda t, rh, x: tower.merkel_pinch(state(t, rh), hot_water=40.0 + x, cold_water=33.0),
    "tower.merkel_number": lambda t, rh, x: tower.merkel_number(
        stream(t, rh, 12.0), water_flow=10.0 + x, hot_water=40.0, cold_water=33.0, quadrature="four_point"
    ),
    "tower.merkel_rate": lambda t, rh, x: tower.merkel_rate(stream(t, rh, 10.0), water_flow=10.0, hot_water=38.0, number=2 * x),
    "tower.air_for_duty": lambda t, rh, x: tower.air_for_duty(
        state(t, rh), water_flow=10.0 + x, hot_water=40.0, cold_water=33.0, coefficient=1.6, exponent=0.6
    ),
    "tower.effectiveness_number": lambda t, rh, x: tower.effectiveness_number(
        stream(t, rh, 12.0), water_flow=10.0 + x, hot_water=40.0, cold_water=33.0
    ),
    "tower.effectiveness_rate": lambda t, rh, x: tower.effectiveness_rate(
        stream(t, rh, 10.0), water_flow=10.0, hot_water=38.0, number=2 * x
    ),
    "tower.poppe_number": lambda t, rh, x: tower.poppe_number(
        stream(t, rh, 12.0), water_flow=10.0 + x, hot_water=40.0, cold_water=33.0, transfer="lewis_factor_one"
    ),
    "tower.poppe_rate": lambda t, rh, x: tower.poppe_rate(stream(t, rh, 6.0), water_flow=10.0, hot_water=38.0, number=2 * x),
    "tower.fill_from_two_tests": lambda t, rh, x: tower.fill_from_two_tests(
        first_water_to_air=0.8, first_number=1.9 + x, second_water_to_air=1.6, second_number=1.25 + 0 * (t + rh)
    ),
    "tower.fill_number": lambda t, rh, x: tower.fill_number(coefficient=1.5 + 0 * t, exponent=rh, water_to_air=0.5 + x),
    "tower.fill_height": lambda t, rh, x: tower.fill_height(
        coefficient=1.5 + 0 * t, exponent=rh, number=1.0, water_to_air=0.5 + x, tested_height=1.2
    ),
    "tower.cycles_of_concentration": lambda t, rh, x: tower.cycles_of_concentration(
        circulating=1e3 * (1.0 + x), make_up=500.0 + 0 * (t + rh)
    ),
    "tower.evaporation_by_rule_of_thumb": lambda t, rh, x: tower.evaporation_by_rule_of_thumb(
        circulating_flow=10.0 + x, water_range=5.0 + 0 * (t + rh)
    ),
    "tower.basin_after": lambda t, rh, x: tower.basin_after(
        concentration=500.0 + t + rh, inventory=8e3, duration=3600.0 * x, blowdown=0.09, drift=0.03, make_up_flow=0.46,
        make_up_concentration=500.0,
    ),
    "books.balance": lambda t, rh, x: books.balance(
        [stream(t, rh, 1.0 + x)],
        leaving=sensible.with_heat(stream(t, rh, 1.0 + x), heat=1e3).leaving,
        exchange=sensible.with_heat(stream(t, rh, 1.0 + x), heat=1e3).exchange,
    ),
}

COLUMNS = RNG.uniform(22.0, 38.0, ROWS), RNG.uniform(0.3, 0.6, ROWS), RNG.uniform(0.0, 0.9, ROWS)


def leaves(result, path=""):
    """Every number of a result, states and records taken apart."""
    if isinstance(result, Record):
        for field in dataclasses.fields(result):
            yield from leaves(getattr(result, field.name), f"{path}.{field.name}")
    elif isinstance(result, MoistAir):
        for name in ("dry_bulb", "pressure", "humidity_ratio", "specific_enthalpy", "specific_volume"):
            yield f"{path}.{name}", getattr(result, name)
    else:
        yield path, result


@pytest.mark.parametrize("name", CASES)
def test_rows_are_scalar_calls_bit_for_bit(name):
    case = CASES[name]
    columns = case(*COLUMNS)
    many = dict(leaves(columns))
    compared = 0
    for row, (t, rh, x) in enumerate(zip(*COLUMNS)):
        try:
            one = dict(leaves(case(float(t), float(rh), float(x))))
        except moistair.MoistAirError as error:
            assert columns.status[row] == error.code
            continue
        assert one.keys() == many.keys()
        for path, value in one.items():
            assert isinstance(value, (float, bool, enum.IntEnum)), path
            assert np.shape(many[path]) == (ROWS,)
            assert same_bits(float(many[path][row]), float(value)), (path, row)
            compared += 1
    assert compared >= ROWS // 2


def test_every_process_is_covered():
    public = {
        f"{module.__name__.rpartition('.')[2]}.{name}"
        for module in (books, coil, desiccant, evaporative, humidify, mixing, reheat, room, sensible, tower)
        for name in module.__all__
        if name[0].islower()
    }
    assert public <= set(CASES)


@pytest.mark.parametrize("formulation", FORMULATIONS)
def test_books_close(formulation):
    t, rh, x = COLUMNS
    entering = stream(t, rh, 1.0 + x, formulation=formulation)
    outdoor = stream(-5.0, 0.8, 1.0, formulation=formulation)
    cold = state(8.0, 0.95, formulation=formulation)
    for result in (
        sensible.with_heat(entering, heat=3e3 * x),
        coil.to_state(entering, leaving=cold),
        humidify.steam(entering, steam_flow=0.01 * x, steam_enthalpy=STEAM),
        humidify.spray(entering, water_flow=0.01 * x, water_temperature=20.0),
    ):
        book = books.balance([entering], leaving=result.leaving, exchange=result.exchange)
        assert book.close.dtype == np.bool_ and book.close.all()
    mixed = mixing.adiabatic(entering, outdoor)
    assert books.balance([entering, outdoor], leaving=mixed.leaving, exchange=mixed.exchange).close.all()
    # A book that lacks what was exchanged does not close.
    heated = sensible.with_heat(entering, heat=1e3)
    assert not books.balance([entering], leaving=heated.leaving, exchange=mixed.exchange).close.any()


def test_a_bad_row_costs_only_itself():
    t = np.array([30.0, np.nan, 30.0, 30.0])
    flow = np.array([1.0, 1.0, -1.0, 0.0])
    entering = stream(t, 0.5, flow)
    assert entering.status.tolist() == [0, 201, 202, 0] and entering.failed == 2
    heated = sensible.with_heat(entering, heat=1e3)
    assert heated.status.tolist() == [0, 201, 202, 207]
    assert heated.leaving.air.status.tolist() == [0, 201, 202, 207]
    assert np.isnan(heated.exchange.heat).tolist() == [False, True, True, True]
    cooled = coil.to_state(entering, leaving=state(10.0, 0.9))
    assert cooled.regime.tolist() == [1, -1, -1, 0] and cooled.regime.dtype == np.int32


def test_nothing_is_fine():
    none = sensible.with_heat(stream(np.zeros((0, 2)), 0.5, 1.0), heat=1.0)
    assert none.leaving.air.shape == (0, 2) and none.exchange.heat.shape == (0, 2) and none.failed == 0


def test_broadcasting():
    entering = stream(np.linspace(25.0, 35.0, 3)[:, None], 0.5, 1.0)
    result = sensible.with_heat(entering, heat=np.array([0.0, 1e3]))
    assert result.leaving.air.shape == (3, 2) and result.exchange.heat.shape == (3, 2)
    with pytest.raises(ValueError, match="shapes do not match"):
        sensible.with_heat(entering, heat=np.zeros((4, 1)))


def test_choices():
    entering, leaving = stream(30.0, 0.5, 1.0), state(10.0, 0.95)
    with pytest.raises(ValueError, match="condensate_temperature must be 'leaving_air' or 'apparatus'"):
        coil.to_state(entering, leaving=leaving, condensate_temperature="cold")
    with pytest.raises(ValueError, match="freezing"):
        mixing.adiabatic_at(entering, pressure=SEA_LEVEL, freezing="never")
    with pytest.raises(ValueError, match="water_temperature"):
        humidify.evaporative(entering, saturation_effectiveness=0.5, water_temperature="warm")
    default = coil.to_state(entering, leaving=leaving)
    assert default == coil.to_state(entering, leaving=leaving, condensate_temperature=10.0)
    assert default != coil.to_state(entering, leaving=leaving, condensate_temperature=5.0)
    apparatus = coil.apparatus_dew_point(entering.air, leaving=leaving).dew_point
    drained = coil.to_state(entering, leaving=leaving, condensate_temperature="apparatus")
    assert drained == coil.to_state(entering, leaving=leaving, condensate_temperature=apparatus)


def test_coils_with_water():
    entering = stream(30.0, 0.6, 1.5)
    water = {"water_flow": 2.0, "entering_water": 6.0}
    done = coil.with_water(entering, air_side=4e3, water_side=8e3, **water)
    assert done.air.regime is coil.CoilRegime.WET and done.freezing is False and done.dry_fraction == 0.0
    warmth = [liquid_water_enthalpy(water_temperature=t, pressure=SEA_LEVEL) for t in (6.0, done.leaving_water)]
    assert math.isclose(2.0 * (warmth[1] - warmth[0]), done.air.cooling_load, rel_tol=1e-9)
    for measured, value in (
        ("leaving_air", done.air.leaving.air.dry_bulb),
        ("leaving_water", done.leaving_water),
        ("heat", done.air.exchange.heat),
    ):
        surface = coil.surface_from_rating(entering, value=value, measured=measured, conductance_ratio=2.0, **water)
        assert math.isclose(surface.air_side, 4e3, rel_tol=1e-6) and math.isclose(surface.water_side, 8e3, rel_tol=1e-6)
    metered = coil.load_by_water(entering, load_by_air=done.air.cooling_load + 500.0, leaving_water=done.leaving_water, **water)
    assert math.isclose(metered.load, done.air.cooling_load, rel_tol=1e-12)
    assert math.isclose(metered.air_less_water, 500.0, rel_tol=1e-9)
    flows = {"found_at_air_flow": 1.5, "found_at_water_flow": 2.0, "air_flow": 1.5, "water_flow": 1.0}
    scaled = coil.surface_at_flows(air_side=4e3, water_side=8e3, air_side_exponent=0.6, water_side_exponent=0.8, **flows)
    assert scaled.air_side == 4e3 and math.isclose(scaled.water_side, 8e3 * 0.5**0.8, rel_tol=1e-15)
    with pytest.raises(moistair.InfeasibleError):
        coil.with_water(entering, air_side=4e3, water_side=8e3, arrangement="cross_flow", **water)
    with pytest.raises(moistair.InfeasibleError):
        coil.surface_from_rating(entering, value=5.0, conductance_ratio=2.0, **water)
    with pytest.raises(ValueError, match="arrangement must be 'counterflow' or 'cross_flow'"):
        coil.with_water(entering, air_side=4e3, water_side=8e3, arrangement="parallel", **water)
    with pytest.raises(ValueError, match="measured"):
        coil.surface_from_rating(entering, value=5.0, measured="load", conductance_ratio=2.0, **water)
    with pytest.raises(TypeError):
        coil.bypass_factor_of_rows(of_one_row=0.5, rows=2.5)


def test_the_catalogue_names_what_the_classes_hold(monkeypatch):
    """Codes of the core in the order of the fields here: the names of both must be the same."""
    catalogue = {name: entry for _, name, *entry in moistair._core.process_table()}
    calls, kinds = [], []
    run, plan = moistair._core.run, moistair._rows._plan

    def recorded_run(name, layout, labels, values, formulation=0):
        calls.append((name, kinds[-1], list(zip(labels, values))))
        return run(name, layout, labels, values, formulation)

    def recorded_plan(kind):
        result = plan(kind)
        kinds.append(kind)
        return result

    monkeypatch.setattr(moistair._core, "run", recorded_run)
    monkeypatch.setattr(moistair._rows, "_plan", recorded_plan)
    for case in CASES.values():
        case(30.0, 0.5, 0.5)
    moistair.saturation_temperature_after(dew_point=10.0, pressure=SEA_LEVEL, new_pressure=2e5, wanted="dew_point")

    state_fields = ["dry_bulb", "humidity_ratio", "pressure"]
    for name, kind, arguments in calls:
        inputs, repeated, outputs = catalogue[name]
        given = []
        for label, value in arguments:
            label = re.sub(r"\[\d+\]", "", label)
            given += [f"{label}.{part}" for part in state_fields] if isinstance(value, MoistAir) else [label]
        fields = [field.removesuffix(".given") for field, _ in inputs]
        while repeated and len(fields) < len(given):
            fields += fields[len(fields) - repeated :]
        if name == "saturation_temperature_after":
            given[1] = "value"
        assert given == fields, name
        assert held(kind) == [field for field, _ in outputs] or len(outputs) == 1, name
    assert {name for name, *_ in calls} == {name for name in catalogue if not name.startswith("air.")}


def held(kind, path=""):
    """The names of the numbers of a class of records."""
    if isinstance(kind, type) and issubclass(kind, Record):
        hints = typing.get_type_hints(kind)
        fields = [(f"{path}.{field.name}", moistair._rows._kind(hints[field.name])) for field in dataclasses.fields(kind)]
        return [name.lstrip(".") for inner, kind in fields for name in held(kind, inner)]
    return [f"{path}.{part}" for part in ("dry_bulb", "humidity_ratio", "pressure")] if kind is MoistAir else [path]


def test_more_streams_than_a_row_takes():
    entering = stream(20.0, 0.5, 1.0)
    most = moistair._core.MAX_STREAMS
    assert mixing.adiabatic(*[entering] * most).leaving.dry_air_flow == most
    with pytest.raises(ValueError, match=f"streams may be at most {most}, not {most + 1}"):
        mixing.adiabatic(*[entering] * (most + 1))


def test_arguments_of_another_class():
    entering = stream(30.0, 0.5, 1.0)
    for call in (
        lambda: sensible.with_heat(entering.air, heat=1.0),
        lambda: sensible.with_heat(entering, heat=entering),
        lambda: sensible.with_heat(entering, heat="1"),
        lambda: sensible.with_heat(entering, heat=None),
        lambda: sensible.with_heat(entering, heat=entering.air),
        lambda: coil.to_state(entering, leaving=3.0),
        lambda: mixing.adiabatic(entering, 1.0),
        lambda: AirStream(3.0, dry_air_flow=1.0),
        lambda: WetStream(3.0, dry_air_flow=1.0),
        lambda: books.balance([entering], leaving=entering, exchange=3.0),
    ):
        with pytest.raises(TypeError):
            call()


def test_the_engine_refuses_what_no_wrapper_sends():
    run = moistair._core.run
    air = state(20.0, 0.5)
    with pytest.raises(RuntimeError):
        run("none", "N", [], [])
    for many in (1.0, np.ones(3)):
        with pytest.raises(TypeError):
            run("sensible.with_heat", "SNNNNN", ["a", "b"], [air, many])
        with pytest.raises((TypeError, RuntimeError)):
            run("stream", "N", ["a", "b"], [air, many])
        with pytest.raises(TypeError):
            run("wet_air.from_enthalpy_and_water", "SNNNNN", list("abcde"), [4e4, 0.01, 0.5, 1e5, many])


def test_records_do_not_change():
    one, many = stream(30.0, 0.5, 1.0), stream(np.array([30.0, 31.0]), 0.5, 1.0)
    with pytest.raises(dataclasses.FrozenInstanceError):
        one.dry_air_flow = 3.0
    with pytest.raises(ValueError):
        many.dry_air_flow[0] = 3.0
    for record in (one, many, coil.to_state(many, leaving=state(10.0, 0.9)), coil.to_state(one, leaving=state(10.0, 0.9))):
        again = pickle.loads(pickle.dumps(record))
        assert again == record and repr(record).startswith(type(record).__name__)
        with pytest.raises(TypeError):
            hash(record)
    with pytest.raises(ValueError):
        again = pickle.loads(pickle.dumps(many))
        again.dry_air_flow[0] = 3.0
    assert one != many and one != 3


def test_wet_streams_lead_on():
    fog = mixing.adiabatic(stream(30.0, 0.9, 1.0), stream(-10.0, 0.8, 1.0)).leaving
    assert fog.air.is_wet is True and fog.air.liquid > 0.0
    gas = fog.without_condensate
    assert isinstance(gas, AirStream) and gas.dry_air_flow == 2.0
    again = mixing.adiabatic(fog)
    assert again.leaving == fog  # a single stream leaves as it came
    many = mixing.adiabatic(stream(np.array([30.0, 20.0]), 0.9, 1.0), stream(-10.0, 0.8, 1.0)).leaving
    assert many.air.is_wet.dtype == np.bool_
    assert mixing.adiabatic(many, stream(20.0, 0.5, 0.0)).leaving.air.liquid.shape == (2,)


def test_outlets_beyond_saturation_by_a_rounding_keep_their_bits():
    """What saturates at an outlet solved for, read again, pickled, and led on."""
    t = np.linspace(5.0, 45.0, 400)
    fog = mixing.adiabatic(stream(t, 0.95, 1.0), stream(-20.0, 0.8, 1.0)).leaving.air
    again = pickle.loads(pickle.dumps(fog.air))
    for name in ("humidity_ratio", "specific_enthalpy", "relative_humidity"):
        assert same_bits(getattr(again, name), getattr(fog.air, name))
    assert fog.air.failed == 0


def test_rooms_and_reheat():
    space, outdoor = state(24.0, 0.5), state(32.0, 0.5)
    gains = {"sensible": 3e3, "moisture": 1.5e-3, "source_value": 32.0}
    supplied = room.supply_at_flow(space, dry_air_flow=0.5, **gains)
    again = room.room_of_supply(supplied.supply, **gains).room.air.air
    assert math.isclose(again.dry_bulb, 24.0, abs_tol=1e-9) and math.isclose(again.relative_humidity, 0.5, rel_tol=1e-9)
    found = room.gains_between(supplied.supply, room=space, source_value=32.0)
    assert math.isclose(found.sensible, 3e3, rel_tol=1e-9) and math.isclose(found.moisture, 1.5e-3, rel_tol=1e-9)
    assert books.balance([supplied.supply], leaving=supplied.room, exchange=supplied.exchange).close

    ratio = room.sensible_heat_ratio(space, **gains)
    slope = room.slope_of_ratio(space, sensible_heat_ratio=ratio)
    assert math.isclose(slope, room.process_slope(pressure=SEA_LEVEL, **gains), rel_tol=1e-12)
    limit = room.limiting_line(space, entering=outdoor, coil_leaving=0.95)
    least = room.least_reheat(space, entering=outdoor, coil_leaving=0.95, **gains)
    assert ratio < limit.sensible_heat_ratio and least.cause is room.ReheatCause.LINE_MISSES_COIL
    assert math.isclose(least.reheat, 1.5e-3 * (limit.slope - slope), rel_tol=1e-6)
    entering = AirStream(outdoor, dry_air_flow=least.supply.dry_air_flow)
    kept = room.conditioned(space, entering=entering, coil_leaving=0.95, **gains)
    assert math.isclose(kept.reheat.reheat, least.reheat, rel_tol=1e-4)
    with pytest.raises(moistair.InfeasibleError) as refused:
        reheat.with_coil(entering, target=state(20.0, 0.5), coil_leaving=0.1, characteristic="bypass", coldest=9.0)
    assert refused.value.quantity == "apparatus_dew_point"
    with pytest.raises(ValueError, match="characteristic must be 'relative_humidity' or 'bypass'"):
        room.limiting_line(space, entering=outdoor, coil_leaving=0.95, characteristic="wet")
    with pytest.raises(ValueError, match="source must be"):
        room.sensible_heat_ratio(space, sensible=1.0, moisture=0.0, source_value=30.0, source="people")


def test_desiccants():
    process, outdoor = stream(26.0, 0.55, 1.0), stream(32.0, 0.45, 0.8)
    wheel = desiccant.wheel(process, target=0.007, sorption_heat_ratio=1.1, regeneration=outdoor, value=90.0)
    assert wheel.wheel is desiccant.WheelStatus.POSSIBLE and wheel.entropy_production > 0.0
    assert books.balance([process], leaving=wheel.process.leaving, exchange=wheel.process.exchange).close
    hot = wheel.heater.leaving
    assert books.balance([hot], leaving=wheel.regeneration, exchange=wheel.regeneration_exchange).close
    by_heat = desiccant.wheel(
        process, target=0.007, sorption_heat_ratio=1.1, regeneration=outdoor, value=wheel.regeneration_heat, heater="heat"
    )
    assert math.isclose(by_heat.heater.leaving.air.dry_bulb, 90.0, abs_tol=1e-9)
    turned = desiccant.wheel_by_potentials(process, regeneration=hot, first_effectiveness=0.07, second_effectiveness=0.9)
    # So much less air behind the wheel cannot be led by the same effectiveness.
    assert turned.correlation is desiccant.CorrelationStatus.WITHIN and math.isnan(turned.imbalance.heat)
    balanced = desiccant.wheel_by_potentials(
        process, regeneration=AirStream(hot.air, dry_air_flow=1.0), first_effectiveness=0.07, second_effectiveness=0.9
    )
    assert abs(balanced.imbalance.heat) < 5e3 and balanced.process == turned.process
    tested = desiccant.effectiveness_between(process.air, dried=turned.process.air, regeneration=hot.air)
    assert math.isclose(tested.first, 0.07, abs_tol=1e-9) and math.isclose(tested.second, 0.9, abs_tol=1e-9)
    with pytest.raises(ValueError, match="heater must be"):
        desiccant.wheel(process, target=0.007, sorption_heat_ratio=1.1, regeneration=outdoor, value=1.0, heater="cold")
    cold = stream(-5.0, 0.5, 1.0)
    with pytest.raises(moistair.OutOfRangeError):
        desiccant.wheel_by_potentials(cold, regeneration=hot, first_effectiveness=0.07, second_effectiveness=0.9)
