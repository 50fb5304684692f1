"""Signals: one sample at a time and columns, and the enumerations."""

import copy
import pickle
import re

import moistair
import numpy as np
import pytest
from moistair import account, signal
from moistair.signal import Channel, ChannelState, Checked, Kind, Quality, Reason, Unit
from support import odd_numbers, random, same_bits

NAN = float("nan")


def humidity(**more):
    return Channel(kind=Kind.RELATIVE_HUMIDITY, unit=Unit.PERCENT, minimum=0.0, maximum=1.0, **more)


def test_enumerations_are_those_of_the_core():
    table = moistair._core.code_table()
    for kind, name, code, text in table:
        enumeration = getattr(signal, kind, None) or getattr(account, kind)
        assert getattr(enumeration(code), "text", text) == text
        assert enumeration(code).name == re.sub(r"(?<=[a-z])(?=[A-Z])", "_", name).upper()
    for enumeration in (Kind, Unit, Quality, Reason, account.Rule, account.Added):
        assert len(enumeration) == sum(kind == enumeration.__name__ for kind, *_ in table)
    assert (Unit.KILOPASCAL.text, Reason.HELD.text) == ("kPa", "last good value held")


def test_one_sample_after_the_other():
    channel, state = humidity(interval=60.0, hold=120.0), ChannelState()
    good = channel.check(state, time=0.0, raw=45.0)
    assert (good.value, good.quality, good.reason, good.after_gap) == (0.45, Quality.GOOD, Reason.OK, False)
    assert isinstance(good.quality, Quality) and state.last_good == (0.45, 0.0)
    wet = channel.check(state, time=60.0, raw=101.2)
    assert (wet.value, wet.reason) == (1.0, Reason.ABOVE_SATURATION)
    absent = channel.check(state, time=120.0, raw=NAN)
    assert (absent.value, absent.reason, absent.cause) == (1.0, Reason.HELD, Reason.MISSING)
    wrong = channel.check(state, time=1000.0, raw=150.0)
    assert (wrong.value, wrong.reason, wrong.after_gap) == (None, Reason.ABOVE_RANGE, True)


def test_columns_are_samples_one_after_the_other():
    rng = random(11)
    times = np.cumsum(rng.uniform(-10.0, 120.0, 2000))
    raws = np.where(rng.random(2000) < 0.2, odd_numbers(rng, 2000), rng.uniform(0.0, 104.0, 2000))
    references = np.round(rng.uniform(0.0, 3.0, 2000))
    for reference in (None, references):
        channel = humidity(interval=60.0, hold=300.0, stuck_samples=3, stuck_resolution=0.2, reference_resolution=0.5)
        one, many = ChannelState(), ChannelState()
        columns = channel.check(many, time=times, raw=raws, reference=reference)
        assert len(columns) == 2000
        seen = set()
        for row in range(2000):
            beside = None if reference is None else float(reference[row])
            sample = channel.check(one, time=float(times[row]), raw=float(raws[row]), reference=beside)
            value = np.nan if sample.value is None else sample.value
            assert same_bits(columns.value[row], value)
            assert columns.quality[row] == sample.quality and columns.reason[row] == sample.reason
            assert columns.cause[row] == sample.cause and columns.after_gap[row] == sample.after_gap
            seen.add(sample.reason)
        assert one == many and len(seen) >= 7
        for array in (columns.value, columns.quality, columns.after_gap):
            with pytest.raises(ValueError):
                array[0] = 0


def test_shapes():
    channel = humidity()
    assert isinstance(channel.check(ChannelState(), time=np.array(0.0), raw=np.float32(20.0)), Checked)
    assert len(channel.check(ChannelState(), time=[], raw=[])) == 0
    assert channel.check(ChannelState(), time=[0.0, 1.0], raw=20.0).value.tolist() == [0.2, 0.2]
    with pytest.raises(ValueError):
        channel.check(ChannelState(), time=np.zeros((2, 2)), raw=20.0)
    with pytest.raises(ValueError):
        channel.check(ChannelState(), time=[0.0, 1.0], raw=[1.0, 2.0, 3.0])
    with pytest.raises(TypeError):
        channel.check(ChannelState(), time="now", raw=20.0)


def test_a_channel_as_an_object():
    channel = humidity(interval=60.0, hold=30.0, stuck_samples=5, stuck_resolution=0.1, slip_samples=0)
    assert pickle.loads(pickle.dumps(channel)) == channel and copy.copy(channel) == channel
    assert channel != humidity()
    assert (channel.kind, channel.unit, channel.minimum, channel.maximum) == (Kind.RELATIVE_HUMIDITY, Unit.PERCENT, 0.0, 1.0)
    assert (channel.interval, channel.hold, channel.stuck_samples, channel.slip_samples) == (60.0, 30.0, 5, 0)
    assert channel.is_valid and not Channel(kind=Kind.PRESSURE, unit=Unit.PERCENT, minimum=0.0, maximum=1.0).is_valid
    assert eval(repr(channel), {"Channel": Channel}) == channel
    with pytest.raises(ValueError):
        Channel(kind=99, unit=Unit.PERCENT, minimum=0.0, maximum=1.0)
    with pytest.raises(AttributeError):
        channel.hold = 3.0


def test_state_and_samples_as_objects():
    channel, state = humidity(hold=100.0), ChannelState()
    fresh = copy.deepcopy(state)
    sample = channel.check(state, time=5.0, raw=45.0)
    assert state != fresh and fresh == ChannelState()
    restored = pickle.loads(pickle.dumps(state))
    assert restored == state and restored.last_good == (0.45, 5.0)
    assert channel.check(restored, time=6.0, raw=NAN).value == 0.45
    assert pickle.loads(pickle.dumps(sample)) == sample
    refused = channel.check(ChannelState(), time=0.0, raw=NAN)
    assert pickle.loads(pickle.dumps(refused)) == refused and refused != sample


def test_unpickling_refuses_nonsense():
    restore = moistair._core.restore_owned
    (_, (kind, order, data)) = ChannelState().__reduce__()
    for wrong in ((kind, order, data[:-1]), (kind, order, b""), ("Nothing", order, data), (kind, "middle", data)):
        with pytest.raises(ValueError):
            restore(*wrong)
    with pytest.raises(ValueError):
        moistair._core.restore_checked(None, 0, 0, 0, False)
    # Any bits are a state: it may misjudge some samples, and recovers.
    rng = random(12)
    for _ in range(50):
        damaged = restore(kind, order, rng.bytes(len(data)))
        checked = humidity(hold=10.0).check(damaged, time=np.arange(20.0) * 60.0, raw=np.linspace(40.0, 60.0, 20))
        assert checked.quality[-1] == Quality.GOOD


def test_units():
    assert signal.to_core(45.0, unit=Unit.PERCENT) == 0.45
    assert signal.from_core(9e6, unit=Unit.KILOWATT_HOUR) == 2.5
    assert signal.to_core([32.0, 212.0], unit=Unit.FAHRENHEIT).tolist() == [0.0, 100.0]
    assert signal.from_core(np.array(100.0), unit=Unit.FAHRENHEIT) == 212.0
    with pytest.raises(ValueError):
        signal.to_core(1.0, unit=0)
