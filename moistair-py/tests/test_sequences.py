"""Chains of processes: the calls of their own, rows beside single rows, numbers solved for, odd numbers in every argument."""

import pickle

import moistair
import numpy as np
import pytest
from moistair import MoistAir
from moistair.process import AirStream, AirWithCondensate, WetStream, coil, compression, humidify, mixing, reheat, sensible, sequence
from moistair._rows import Record
from support import FUZZ, SEA_LEVEL, odd_numbers, random


def air(t, rh):
    return MoistAir(dry_bulb=t, relative_humidity=rh, pressure=SEA_LEVEL)


def stream(t, rh, flow=1.0):
    return AirStream(air(t, rh), dry_air_flow=flow)


STEAM = {"steam_enthalpy": 2.68e6}
WATER = {"air_side": 2e3, "water_side": 3e3, "water_flow": 0.8, "entering_water": 6.0}

#: A step of every kind, and the process of its own.
EACH = [
    (sequence.ToTemperature(16.0), lambda s: sensible.to_temperature(s, leaving_temperature=16.0)),
    (sequence.WithHeat(4e3), lambda s: sensible.with_heat(s, heat=4e3)),
    (sequence.CoilToState(air(14.0, 0.9), 11.0), lambda s: coil.to_state(s, leaving=air(14.0, 0.9), condensate_temperature=11.0)),
    (sequence.CoilToTemperature(16.0, 0.93), lambda s: coil.to_state(s, leaving=air(16.0, 0.93))),
    (
        sequence.CoilByBypassFactor(apparatus_dew_point=9.0, bypass_factor=0.1, condensate_temperature="apparatus"),
        lambda s: coil.by_bypass_factor(s, apparatus_dew_point=9.0, bypass_factor=0.1, condensate_temperature="apparatus"),
    ),
    (sequence.CoilWithWater(**WATER), lambda s: coil.with_water(s, **WATER).air),
    (sequence.CoilWithWater(**WATER, specific_heat=3.6e3), lambda s: coil.with_water(s, **WATER, specific_heat=3.6e3).air),
    (sequence.CoilWithReheat(air(14.0, 0.9), 0.93), lambda s: reheat.to_state(s, target=air(14.0, 0.9), coil_leaving_relative_humidity=0.93).heating),
    (sequence.Steam(1e-3, **STEAM), lambda s: humidify.steam(s, steam_flow=1e-3, **STEAM)),
    (sequence.SteamToHumidityRatio(0.013, **STEAM), lambda s: humidify.steam_to_humidity_ratio(s, humidity_ratio=0.013, **STEAM)),
    (
        sequence.SteamToRelativeHumidity(0.7, **STEAM),
        lambda s: humidify.steam_to_relative_humidity(s, relative_humidity=0.7, **STEAM),
    ),
    (sequence.Spray(1e-3, 15.0), lambda s: humidify.spray(s, water_flow=1e-3, water_temperature=15.0)),
    (sequence.Evaporative(0.8), lambda s: humidify.evaporative(s, saturation_effectiveness=0.8)),
    (sequence.Evaporative(0.8, 15.0), lambda s: humidify.evaporative(s, saturation_effectiveness=0.8, water_temperature=15.0)),
    (sequence.Mix(stream(5.0, 0.8, 0.5)), lambda s: mixing.adiabatic(s, stream(5.0, 0.8, 0.5))),
    (sequence.DirectCooler(0.85, 0.9, pump_heat=200.0, make_up_temperature=15.0, drift_fraction=1e-4), None),
    (sequence.Wash(2.0, 25.0, 0.8, pump_heat=900.0, carry_over_fraction=1e-4), None),
    (sequence.IndirectCooler(stream(20.0, 0.4), effectiveness=0.6, exhaust_humidity=0.95, effectiveness_of="wet_bulb"), None),
    (sequence.Room(5e3, 1e-3), None),
    (sequence.Room(5e3, 1e-3, moisture_source="enthalpy", source_value=2.55e6), None),
    (sequence.DesiccantToHumidityRatio(0.006, sorption_heat_ratio=1.1, carry_over="rise", carry_over_value=4.0), None),
    (sequence.DesiccantByEffectiveness(0.5, sorption_heat_ratio=1.1, driest=0.001), None),
    (sequence.Compress(1.1e5, 40.0), lambda s: compression.to_pressure(s, pressure=1.1e5, leaving_temperature=40.0)),
]


def assert_balance(entering, step, done):
    """What the step says by name is what it says by exchange and what the air shows."""
    loads, result, leaving = done.total.loads, done.steps[0], done.total.leaving
    heat = loads.recovered + loads.gains + loads.water_heat + loads.fan_work
    water = loads.humidifying_water + loads.moisture_gain + loads.recovered_water - loads.condensate
    assert (heat, water) == (result.exchange.heat, result.exchange.water) and result.books.close
    before = entering.air.humidity_ratio
    assert abs(leaving.air.total_water - before - water) < 1e-15
    changed = heat != 0.0 or water != 0.0 or leaving.air.air.pressure != entering.air.pressure
    assert changed and not result.frost
    assert not result.condenses


@pytest.mark.parametrize("step, alone", EACH, ids=lambda value: type(value).__name__)
def test_each_step_is_its_process(step, alone):
    entering = stream(30.0, 0.4)
    done = sequence.run(entering, [step])
    if alone is None:
        assert_balance(entering, step, done)
        return
    expected = alone(entering)
    leaving = expected.leaving if isinstance(expected.leaving, WetStream) else WetStream(expected.leaving.air, dry_air_flow=expected.leaving.dry_air_flow)
    assert done.total.leaving == leaving == done.steps[0].leaving
    assert done.total.books.close and done.steps[0].books.close
    if not isinstance(step, sequence.CoilWithReheat):
        assert done.total.exchange == expected.exchange
    if isinstance(expected, coil.Cooling):
        assert done.total.loads.cooling == expected.cooling_load
        assert done.steps[0].regime == expected.regime
    else:
        assert done.steps[0].regime == (sequence.StepRegime.WET if isinstance(step, sequence.CoilWithReheat) else sequence.StepRegime.NO_COIL)


def test_every_class_is_tried():
    steps = {value for value in vars(sequence).values() if isinstance(value, type) and issubclass(value, sequence.Step)}
    assert steps - {sequence.Step} == {type(step) for step, _ in EACH} | {sequence.Eliminate}


CHAIN = [
    sequence.Mix(stream(24.0, 0.5, 1.4)),
    sequence.CoilToTemperature(13.0, 0.95),
    sequence.WithHeat(2e3),
    sequence.Spray(1e-3, 15.0),
    sequence.Eliminate(),
]


def numbers(record):
    """All numbers of a record, named."""
    found = {}
    for name, value in vars(record).items():
        if name == "steps":
            for place, step in enumerate(value):
                found |= {f"{place}.{part}": number for part, number in numbers(step).items()}
        elif isinstance(value, Record):
            found |= {f"{name}.{part}": number for part, number in numbers(value).items()}
        elif isinstance(value, MoistAir):
            found |= {f"{name}.{part}": getattr(value, part) for part in ("dry_bulb", "humidity_ratio", "pressure")}
        elif name != "_status":
            found[name] = value
    return found


def test_rows_are_single_rows():
    t, leaving, flow = np.array([[28.0], [33.0], [20.0]]), np.array([10.0, 13.0, 40.0, np.nan]), 0.6
    steps = [CHAIN[0], sequence.CoilToTemperature(leaving, 0.95), *CHAIN[2:]]
    many = sequence.run(stream(t, 0.45, flow), steps)
    assert many.total.loads.cooling.shape == (3, 4)
    assert (many.total.status == [[0, 0, 301, 201]] * 3).all()
    assert many.total.failed == 6 and (many.steps[1].regime[:, 2:] == -1).all()
    for row in np.ndindex(3, 4):
        one = [CHAIN[0], sequence.CoilToTemperature(float(leaving[row[1]]), 0.95), *CHAIN[2:]]
        entering = stream(float(t[row[0], 0]), 0.45, flow)
        if many.total.status[row]:
            with pytest.raises(moistair.MoistAirError, match=r"^step 1 \(from 0\): ") as raised:
                sequence.run(entering, one)
            assert raised.value.code == many.total.status[row]
            assert np.isnan(many.total.loads.cooling[row])
            continue
        alone = numbers(sequence.run(entering, one))
        for name, values in numbers(many).items():
            assert np.broadcast_to(values, (3, 4))[row] == alone[name], name
    assert pickle.loads(pickle.dumps(many.total)) == many.total


def test_droplets():
    fog = [sequence.Mix(stream(-10.0, 0.8))]
    with pytest.raises(moistair.ProcessError, match="step 1.*droplets") as raised:
        sequence.run(stream(30.0, 0.9), [*fog, sequence.Evaporative(0.8)])
    assert raised.value.code == 211
    done = sequence.run(stream(30.0, 0.9), [*fog, sequence.Eliminate(), sequence.Evaporative(0.8)])
    assert done.steps[1].loads.condensate == 2.0 * done.steps[0].leaving.air.liquid > 0.0
    done = sequence.run(stream(30.0, 0.9), [*fog, sequence.ToTemperature(30.0)])
    assert done.steps[0].leaving.air.is_wet and not done.total.leaving.air.is_wet
    carrying = WetStream(AirWithCondensate(air(20.0, 1.0), liquid=1e-3), dry_air_flow=1.0)
    assert sequence.run(carrying, []).total.leaving == carrying


def test_solve():
    entering = stream(33.0, 0.45, 0.6)
    free = {"free": (1, "leaving_temperature"), "low": 5.0, "high": 90.0}
    found = sequence.solve(entering, CHAIN[:3], **free, wanted="humidity_ratio", value=0.008)
    assert found.how == sequence.SolveStatus.SOLVED and found.low.number == 5.0 and found.high.number < 26.7
    assert abs(found.residual) < 1e-16 and found.reached == found.residual + 0.008 and 2 < found.evaluations <= 179
    assert (found.refused.code, found.refused.step) == (301, 1)
    again = sequence.run(entering, [CHAIN[0], sequence.CoilToTemperature(found.number, 0.95), CHAIN[2]])
    assert again.total == found.total and again.steps == found.steps
    none = sequence.solve(entering, CHAIN[:3], **free, wanted="humidity_ratio", value=0.03, after=1)
    assert none.how == sequence.SolveStatus.NO_CROSSING and none.residual < 0.0
    assert none.total.status == none.status == 0

    value = np.array([0.007, 0.008, 0.03, np.nan])
    many = sequence.solve(entering, CHAIN[:3], **free, wanted="humidity_ratio", value=value)
    assert many.how.tolist() == [0, 0, 1, -1] and many.status.tolist() == [0, 0, 0, 201]
    assert many.number[1] == found.number and many.evaluations[1] == found.evaluations
    assert many.steps[1].loads.cooling[1] == found.steps[1].loads.cooling
    assert np.isnan(many.number[3]) and many.refused.code.tolist() == [301, 301, 301, -1]


def test_cautions():
    frosting = sequence.CoilByBypassFactor(apparatus_dew_point=np.array([-8.0, 8.0]), bypass_factor=0.1)
    done = sequence.run(stream(22.0, 0.45), [frosting, sequence.WithHeat(100.0)])
    assert done.steps[0].frost.tolist() == [True, False] and done.total.frost.tolist() == [True, False]
    assert not done.steps[1].frost.any() and not done.total.condenses.any()
    cooler = sequence.IndirectCooler(stream(22.0, 0.45), effectiveness=0.9, exhaust_humidity=0.95)
    assert sequence.run(stream(33.0, 0.85), [cooler]).total.condenses
    for step in (
        sequence.Room(1e3, 0.0, moisture_source="people"),
        sequence.DesiccantByEffectiveness(0.5, sorption_heat_ratio=1.1, carry_over="some"),
        sequence.IndirectCooler(stream(20.0, 0.4), effectiveness=0.6, exhaust_humidity=0.95, effectiveness_of="dry_bulb"),
    ):
        with pytest.raises(ValueError, match="must be"):
            sequence.run(stream(20.0, 0.5), [step])


def test_refused_solves():
    entering, chain = stream(33.0, 0.45, 0.6), CHAIN[:3]
    right = {"free": (1, "leaving_temperature"), "low": 5.0, "high": 20.0, "wanted": "humidity_ratio", "value": 0.008}

    def refused(kind, match, **changed):
        with pytest.raises(kind, match=match):
            sequence.solve(entering, chain, **{**right, **changed})

    refused(ValueError, "step 3 of 3", free=(3, "leaving_temperature"))
    refused(ValueError, "step -1 of 3", free=(-1, "leaving_temperature"))
    refused(ValueError, "step 7 of 3", after=7)
    refused(ValueError, "name of a quantity", free=(1, "leaving"))
    refused(ValueError, "name of a quantity", wanted="humidity")
    refused(moistair.UnknownNameError, "step 1", free=(1, "heat_flow"))
    refused(moistair.UnknownNameError, "step 2", wanted="heat_flow")
    refused(moistair.MoistAirError, "step 0", after=0)
    refused(moistair.OutOfRangeError, "step 1", high=5.0)
    refused(moistair.NotFiniteError, "step 1", low=np.nan)
    with pytest.raises(ValueError, match="at most 32"):
        sequence.solve(entering, [sequence.Eliminate()] * 33, **right)
    with pytest.raises(TypeError, match=r"steps\[1\] must be Step"):
        sequence.run(entering, [CHAIN[0], coil])
    with pytest.raises(TypeError, match="entering"):
        sequence.run(air(20.0, 0.5), chain)
    with pytest.raises(TypeError, match="one of the classes"):
        sequence.run(entering, [sequence.Step()])
    # A run takes any number of steps.
    assert sequence.run(entering, [sequence.WithHeat(1.0)] * 100).total.loads.heating == 100.0


NAMED = {"arrangement", "motor", "effectiveness_of", "moisture_source", "carry_over"}
OTHERS = {"leaving": air(14.0, 0.9), "target": air(14.0, 0.9), "surroundings": air(40.0, 0.3)}
OTHERS |= {name: stream(20.0, 0.4, np.abs(odd_numbers(random(42), FUZZ))) for name in ("stream", "exhaust", "secondary")}


@pytest.mark.parametrize("kind", [type(step) for step, _ in EACH], ids=lambda kind: kind.__name__)
def test_odd_numbers(kind):
    rng = random(41)
    numbers = {name: odd_numbers(rng, FUZZ) for name in kind.__dataclass_fields__ if name not in NAMED | set(OTHERS)}
    step = kind(**numbers, **{name: value for name, value in OTHERS.items() if name in kind.__dataclass_fields__})
    entering = stream(rng.uniform(-40.0, 60.0, FUZZ), rng.uniform(0.0, 0.9, FUZZ))
    done = sequence.run(entering, [step, sequence.Eliminate()])
    allowed = {0, 201, 202, 203, 206, 207, 211, 301, 310, 311, 312, 313}
    assert set(np.unique(done.total.status).tolist()) <= allowed
    assert done.total.books.close[done.total.status == 0].all()
    low, high, value = (odd_numbers(rng, FUZZ) for _ in range(3))
    found = sequence.solve(
        entering, [sequence.ToTemperature(20.0), step], free=(0, "leaving_temperature"), low=low, high=high, wanted="dry_bulb", value=value
    )
    assert set(np.unique(found.status).tolist()) <= allowed
