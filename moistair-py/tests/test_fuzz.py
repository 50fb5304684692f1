"""Odd numbers in every argument of every call: an error of this package or a defined result, never a crash or a panic.

A panic of the core would come as a `BaseException`, which nothing here expects. MOISTAIR_CASES is the number of calls of each kind.
"""

import inspect

import moistair
import numpy as np
import pytest
from moistair import MoistAir, account, signal
from moistair.process import AirStream, AirWithCondensate, WetStream, books, coil, compression, desiccant, economizer, evaporative, humidify, mixing
from moistair.process import liquid_water_enthalpy, reheat, room, sensible, tower
from moistair.process.measured import MeasuredAir, Reading
from support import FORMULATIONS, FUZZ, SEA_LEVEL, SECOND, odd_numbers, random


def check_state(air):
    for name in moistair.PROPERTIES:
        try:
            value = getattr(air, name)
        except moistair.NoValueError:
            continue
        assert np.isfinite(value).all() or air.shape, (air, name, value)
        assert not np.isinf(value).any()


@pytest.mark.parametrize("formulation", FORMULATIONS)
@pytest.mark.parametrize("name", SECOND)
def test_states(name, formulation):
    rng = random(31)
    near = {"dry_bulb": 20.0, "pressure": SEA_LEVEL}
    for _ in range(FUZZ // 4):
        t, x, p = (float(number) for number in odd_numbers(rng, 3))
        # Two ordinary arguments get a call past the first checks.
        t, p = (t, near["pressure"]) if rng.random() < 0.5 else (near["dry_bulb"], p)
        try:
            air = MoistAir(dry_bulb=t, pressure=p, formulation=formulation, **{name: x})
        except moistair.MoistAirError as error:
            assert error.code in (201, 202, 203, 310, 311, 312, 313)
            continue
        check_state(air)
    t, x, p = (odd_numbers(rng, FUZZ) for _ in range(3))
    t, p = np.where(rng.random(FUZZ) < 0.7, 20.0, t), np.where(rng.random(FUZZ) < 0.7, SEA_LEVEL, p)
    many = MoistAir(dry_bulb=t, pressure=p, formulation=formulation, **{name: x})
    good = many.status == 0
    assert many.failed == np.count_nonzero(~good)
    for values in many.properties(*moistair.PROPERTIES).values():
        assert np.isnan(values[~good]).all() and not np.isinf(values).any()


def streams(rng, count):
    t, rh = rng.uniform(-60.0, 120.0, count), rng.uniform(0.0, 0.9, count)
    flow = np.abs(odd_numbers(rng, count))
    return AirStream(MoistAir(dry_bulb=t, relative_humidity_over_liquid=rh, pressure=SEA_LEVEL), dry_air_flow=flow)


def reading(rng, count, near, uncertainty):
    value, doubt = odd_numbers(rng, count), odd_numbers(rng, count)
    value = np.where(rng.random(count) < 0.7, near, value)
    doubt = np.where(rng.random(count) < 0.7, uncertainty, doubt)
    return Reading(value, standard_uncertainty=doubt, quality=rng.choice([0, 0, 0, 1, 2], count))


def measured(rng, count):
    return MeasuredAir(dry_bulb=reading(rng, count, 20.0, 0.2), relative_humidity=reading(rng, count, 0.5, 0.02))


def arguments(function, rng, count):
    """Odd numbers for the numbers of a process, states and streams for the rest."""
    positional, keywords = [], {}
    # The target of a desiccant is a humidity ratio.
    state_names = {"leaving", "air", "room", "dried"} | ({"target"} if function.__module__.endswith("reheat") else set())
    mixing_names = {"outdoor", "returned", "mixed", "other"}
    of_readings = (mixing.outdoor_air_from_readings, mixing.outdoor_air_from_flows)
    for name, parameter in inspect.signature(function).parameters.items():
        if parameter.kind is inspect.Parameter.VAR_POSITIONAL:
            positional.extend(streams(rng, count) for _ in range(3))
        elif name == "entering":
            whole = streams(rng, count)
            of_state = (tower.with_leaving_air, coil.apparatus_dew_point, coil.apparatus_dew_points)
            of_state += (room.limiting_line, room.least_reheat)
            keywords[name] = whole.air if function in of_state else whole
        elif name in ("primary", "secondary"):
            keywords[name] = streams(rng, count)
        elif name in ("part", "supply", "regeneration"):
            whole = streams(rng, count)
            keywords[name] = whole.air if function is desiccant.effectiveness_between else whole
        elif name in state_names:
            keywords[name] = streams(rng, count).air
        elif name in mixing_names and function in of_readings:
            keywords[name] = reading(rng, count, 20.0 * rng.random(), 0.2)
        elif name in mixing_names and function is mixing.outdoor_air_from_air:
            keywords[name] = measured(rng, count)
        elif name in mixing_names:
            keywords[name] = streams(rng, count).air
        elif name == "quantity":
            keywords[name] = "specific_enthalpy" if function is mixing.outdoor_air_from_air else "dry_bulb"
        elif name in ("other_is", "freezing", "formulation", "arrangement", "measured", "quadrature", "transfer", "source", "characteristic", "carry_over", "heater", "effectiveness_of"):
            continue
        elif name == "rows":
            keywords[name] = 3
        else:
            keywords[name] = odd_numbers(rng, count)
    return positional, keywords


PROCESSES = [
    getattr(module, name)
    for module in (coil, compression, desiccant, economizer, evaporative, humidify, mixing, reheat, room, sensible, tower)
    for name in module.__all__
    if name[0].islower()
]
PROCESSES += [liquid_water_enthalpy, AirWithCondensate.from_enthalpy_and_water, AirWithCondensate.from_dry_bulb_and_water]


@pytest.mark.parametrize("function", PROCESSES, ids=lambda function: f"{function.__module__}.{function.__name__}")
def test_processes(function):
    rng = random(32)
    positional, keywords = arguments(function, rng, FUZZ)
    many = function(*positional, **keywords)
    if isinstance(many, np.ndarray):
        assert many.shape == (FUZZ,)
        return
    assert many.status.shape == (FUZZ,)
    allowed = {0, 102, 201, 202, 203, 205, 206, 207, 301, 310, 311, 312, 313}
    assert set(np.unique(many.status).tolist()) <= allowed
    assert many.failed == np.count_nonzero(many.status)


@pytest.mark.parametrize("rule", economizer.EconomizerRule)
def test_an_economizer_always_decides(rule):
    rng = random(38)
    for _ in range(20):
        numbers = odd_numbers(rng, 9) if rng.random() < 0.5 else np.array([1.0, 1e3, 0.0, 0.0, 0.0, 24.0, 47e3, 13.0, 14.0])
        kelvins, joules, on, off, freeze, dry_bulb, enthalpy, dew_point, supply = (float(number) for number in numbers)
        settings = economizer.Economizer(
            rule=rule,
            pressure=SEA_LEVEL,
            dry_bulb_limit=dry_bulb,
            enthalpy_limit=enthalpy,
            dew_point_limit=dew_point,
            supply_temperature=supply,
            temperature_hysteresis=kelvins,
            enthalpy_hysteresis=joules,
            least_time_on=on,
            least_time_off=off,
            freeze_limit=freeze,
            fallback="dry_bulb",
        )
        count = max(FUZZ // 20, 10)
        time = np.where(rng.random(count) < 0.5, np.arange(count) * 60.0, odd_numbers(rng, count))
        outdoor, returned = measured(rng, count), measured(rng, count)
        many = settings.decide(economizer.EconomizerState(), time=time, outdoor=outdoor, returned=returned)
        for values in (many.margin, many.margin_uncertainty, many.confidence):
            assert np.isfinite(values).all()
        assert ((many.confidence >= 0.0) & (many.confidence <= 1.0)).all()
        value, quality = np.asarray(outdoor.dry_bulb.value), np.asarray(outdoor.dry_bulb.quality)
        assert not many.enabled[~np.isfinite(value) | (quality == 2)].any()


@pytest.mark.parametrize("formulation", FORMULATIONS)
@pytest.mark.parametrize("bulb", ("water", "ice"))
def test_psychrometers(bulb, formulation):
    rng = random(36)
    t, x, p, a = (odd_numbers(rng, FUZZ) for _ in range(4))
    t, p = np.where(rng.random(FUZZ) < 0.7, 5.0, t), np.where(rng.random(FUZZ) < 0.7, SEA_LEVEL, p)
    a = np.where(rng.random(FUZZ) < 0.7, 6e-4, a)
    settings = {"bulb": bulb, "coefficient": a}
    many = MoistAir.from_psychrometer(dry_bulb=t, wet_bulb=x, pressure=p, formulation=formulation, **settings)
    assert many.failed == np.count_nonzero(many.status) and many.shape == (FUZZ,)
    assert set(np.unique(many.status).tolist()) <= {0, 201, 202, 203, 311, 312, 313}
    check_state(many)
    assert many.psychrometer_reading(**settings).shape == (FUZZ,)


def test_other_pressures():
    rng = random(37)
    air = streams(rng, FUZZ).air
    t, p, q = (odd_numbers(rng, FUZZ) for _ in range(3))
    p = np.where(rng.random(FUZZ) < 0.5, 700e3, p)
    for changed in (air.at_pressure(p), air.at_temperature_and_pressure(dry_bulb=t, pressure=p)):
        assert set(np.unique(changed.status).tolist()) <= {0, 201, 202, 203, 311, 312}
    for name, wanted in (("dew_point", "frost_point"), ("frost_point", "dew_point")):
        after = moistair.saturation_temperature_after(pressure=p, new_pressure=q, wanted=wanted, **{name: t})
        assert not np.isinf(after).any()
    assert not np.isinf(air.dew_point_at(p)).any() and not np.isinf(air.frost_point_at(p)).any()


def test_books_of_anything():
    rng = random(33)
    entering, leaving = streams(rng, FUZZ), streams(rng, FUZZ)
    exchange = sensible.with_heat(streams(rng, FUZZ), heat=odd_numbers(rng, FUZZ)).exchange
    assert books.balance([entering], leaving=leaving, exchange=exchange).close.shape == (FUZZ,)


def test_wet_streams_of_anything():
    rng = random(34)
    air = streams(rng, FUZZ).air
    wet = AirWithCondensate(air, liquid=odd_numbers(rng, FUZZ), ice=odd_numbers(rng, FUZZ))
    mixed = mixing.adiabatic(WetStream(wet, dry_air_flow=odd_numbers(rng, FUZZ)), streams(rng, FUZZ))
    assert mixed.status.shape == (FUZZ,)


def test_signals_and_totals():
    rng = random(35)
    for _ in range(max(FUZZ // 10, 3)):
        numbers = [float(number) for number in odd_numbers(rng, 6)]
        channel = signal.Channel(
            kind=int(rng.integers(1, 10)),
            unit=int(rng.integers(1, 23)),
            minimum=numbers[0],
            maximum=numbers[1],
            interval=numbers[2],
            hold=numbers[3],
            stuck_samples=int(rng.integers(0, 5)),
            stuck_resolution=numbers[4],
            reference_resolution=numbers[5],
        )
        time, raw, rate = (odd_numbers(rng, 200) for _ in range(3))
        checked = channel.check(signal.ChannelState(), time=time, raw=raw, reference=rate)
        used = checked.quality != signal.Quality.REFUSED
        assert np.isfinite(checked.value[used]).all() and np.isnan(checked.value[~used]).all()
        total = account.Total(rule=int(rng.integers(0, 2)), longest_step=numbers[2])
        total.add(time=time, rate=rate, quality=checked.quality)
        assert np.isfinite([total.total, total.positive, total.negative, total.coverage]).all()
        periods = account.Periods(length=numbers[3], rule=0, longest_step=numbers[4])
        periods.add(time=time, rate=rate, quality=checked.quality)
        counts = account.Counts()
        counts.record(checked)
        assert counts.samples == 200
        signal.to_core(raw, unit=channel.unit)
        signal.from_core(raw, unit=channel.unit)
        for function in (moistair.pressure_at_elevation, moistair.temperature_at_elevation, moistair.elevation_at_pressure):
            function(raw)
            for value in raw[:20].tolist():
                try:
                    function(value)
                except moistair.MoistAirError as error:
                    assert error.code in (201, 202)
