"""Totals, periods, counts, residuals: columns against single samples, merging, objects."""

import copy
import pickle

import numpy as np
import pytest
from moistair import MoistAir
from moistair.account import Added, BooksTotal, Counts, Deviation, Periods, Residuals, Rule, Sum, Total
from moistair.process import AirStream, books, sensible
from moistair.signal import Channel, ChannelState, Kind, Quality, Reason, Unit
from support import odd_numbers, random

EMPTY = (Sum, Counts, Residuals, BooksTotal, Deviation)


def total():
    return Total(rule=Rule.TRAPEZOID, longest_step=90.0)


def samples(count, seed):
    rng = random(seed)
    times = np.cumsum(rng.uniform(-20.0, 100.0, count))
    rates = np.where(rng.random(count) < 0.1, odd_numbers(rng, count), rng.normal(0.0, 1e3, count))
    return times, rates, rng.integers(0, 3, count)


@pytest.mark.parametrize("rule", Rule)
def test_a_column_is_its_samples(rule):
    times, rates, qualities = samples(3000, seed=21)
    one, many = (Total(rule=rule, longest_step=90.0) for _ in range(2))
    added = many.add(time=times, rate=rates, quality=qualities)
    single = [one.add(time=float(t), rate=float(r), quality=Quality(q)) for t, r, q in zip(times, rates, qualities)]
    assert added.dtype == np.int32 and added.tolist() == single and isinstance(single[0], Added)
    assert one == many and {Added.COUNTED, Added.HOLE, Added.GAP, Added.TIME_REFUSED} <= set(single)


def test_values():
    heat = Total(rule=Rule.STEP, longest_step=90.0)
    assert (heat.mean, heat.lowest, heat.highest, heat.coverage) == (None, None, None, 0.0)
    heat.add(time=[0.0, 60.0, 120.0, 420.0], rate=[2000.0, -1000.0, 500.0, 500.0])
    assert (heat.total, heat.positive, heat.negative) == (60_000.0, 120_000.0, -60_000.0)
    assert (heat.mean, heat.lowest, heat.highest) == (500.0, -1000.0, 2000.0)
    assert (heat.covered_seconds, heat.repaired_seconds, heat.elapsed_seconds) == (120.0, 0.0, 420.0)
    assert (heat.coverage, heat.coverage_of(240.0)) == (120.0 / 420.0, 0.5)
    assert (heat.rule, heat.longest_step) == (Rule.STEP, 90.0)
    assert "60000.0" in repr(heat)


def test_quality_is_checked_before_anything_is_added():
    heat = total()
    for wrong in (7, -1, 0.5, float("nan"), [0, 7], [0.0, float("nan")]):
        with pytest.raises(ValueError):
            heat.add(time=[0.0, 1.0] if isinstance(wrong, list) else 0.0, rate=1.0, quality=wrong)
    assert heat == total()
    with pytest.raises(ValueError):
        Total(rule=9, longest_step=1.0)


def test_periods():
    times = np.arange(0.0, 6.0 * 3600.0, 60.0) + 30.0
    rates = np.sin(times)
    hours, single = (Periods(length=3600.0, rule=Rule.TRAPEZOID, longest_step=90.0) for _ in range(2))
    finished = hours.add(time=times, rate=rates)
    one_by_one = [period for t, r in zip(times, rates) for period in single.add(time=float(t), rate=float(r))]
    assert finished == one_by_one and hours == single
    assert [period.start for period in finished] == [0.0, 3600.0, 7200.0, 10_800.0, 14_400.0]
    assert hours.start == 18_000.0 and hours.unfinished.start == 18_000.0
    whole = Total(rule=Rule.TRAPEZOID, longest_step=90.0)
    for period in finished:
        assert whole.merge(period.total)
    assert whole.merge(hours.current)
    reference = Total(rule=Rule.TRAPEZOID, longest_step=90.0)
    reference.add(time=times, rate=rates)
    assert whole.total == pytest.approx(reference.total, rel=1e-12) and whole.covered_seconds == reference.covered_seconds
    assert pickle.loads(pickle.dumps(finished)) == finished
    assert Periods(length=3600.0, rule=Rule.STEP, longest_step=1.0).unfinished is None


def test_counts():
    channel = Channel(kind=Kind.TEMPERATURE, unit=Unit.CELSIUS, minimum=-40.0, maximum=60.0, hold=100.0)
    raws = np.array([21.5, np.nan, -999.0, 20.0])
    counts, single = Counts(), Counts()
    counts.record(channel.check(ChannelState(), time=np.arange(4.0) * 60.0, raw=raws))
    state = ChannelState()
    for row, raw in enumerate(raws):
        single.record(channel.check(state, time=row * 60.0, raw=float(raw)))
    assert counts == single and counts.samples == 4
    assert counts.quality(Quality.GOOD) == 2 and counts.reason(Reason.HELD) == 1
    assert counts.held_because(Reason.MISSING) == 1 and counts.share(Quality.REFUSED) == 0.25 and counts.gaps == 0
    counts.merge(counts)
    assert counts.samples == 8
    with pytest.raises(TypeError):
        counts.record(3)
    with pytest.raises(ValueError):
        counts.quality(9)


def test_books_are_counted():
    air = MoistAir(dry_bulb=np.linspace(0.0, 30.0, 5), relative_humidity=0.5, pressure=101_325.0)
    entering = AirStream(air, dry_air_flow=2.0)
    heated = sensible.with_heat(entering, heat=1e3)
    book = BooksTotal()
    assert book.record(books.balance([entering], leaving=heated.leaving, exchange=heated.exchange)) is True
    assert (book.heat.samples, book.water.samples, book.closed) == (5, 5, 5)
    other = sensible.with_heat(entering, heat=2e3)
    book.record(books.balance([entering], leaving=heated.leaving, exchange=other.exchange))
    assert (book.heat.samples, book.closed) == (10, 5) and book.heat.largest_in_epsilons > 8.0
    with pytest.raises(AttributeError):
        book.record(3)


def test_sums():
    book = BooksTotal()
    assert book.add(heat=1e-9, heat_scale=2e4, water=-2e-19, water_scale=5e-3)
    assert not book.add(heat=[0.0, np.nan], heat_scale=1.0, water=0.0, water_scale=1.0)
    assert (book.heat.samples, book.heat.refused, book.water.samples) == (2, 1, 3)
    residuals = Residuals()
    assert residuals.add(residual=-1.0, scale=4.0) and not residuals.add(residual=1.0, scale=0.0)
    assert (residuals.relative, residuals.sum_of_residuals, residuals.sum_of_scales) == (0.25, 1.0, 4.0)
    deviation = Deviation()
    assert deviation.mean is None and deviation.add(measured=[21.0, 22.0], computed=20.0)
    assert (deviation.mean, deviation.root_mean_square) == (1.5, 2.5**0.5)
    assert not deviation.add(measured=np.nan, computed=1.0) and deviation.refused == 1
    plain = Sum()
    assert [plain.add(x) for x in (1.0, 1e100, 1.0, -1e100, np.nan)] == [True] * 4 + [False] and plain.value == 2.0


def full():
    """One of each, with something in it."""
    times, rates, qualities = samples(50, seed=22)
    a, b = total(), Periods(length=600.0, rule=Rule.STEP, longest_step=90.0)
    a.add(time=times, rate=rates, quality=qualities)
    b.add(time=times, rate=rates, quality=qualities)
    c, d, e, f, g = (kind() for kind in EMPTY)
    c.add(3.5)
    d.record(Channel(kind=1, unit=1, minimum=0.0, maximum=1.0).check(ChannelState(), time=times, raw=rates))
    e.add(residual=1.0, scale=2.0)
    f.add(heat=1.0, heat_scale=2.0, water=3.0, water_scale=4.0)
    g.add(measured=1.0, computed=2.0)
    return a, b, c, d, e, f, g


def test_objects():
    for thing in full():
        again = pickle.loads(pickle.dumps(thing))
        assert again == thing and type(again) is type(thing)
        assert copy.copy(thing) == thing and copy.copy(thing) is not thing
        assert copy.deepcopy(thing) == thing and thing != 3
        with pytest.raises(TypeError):
            hash(thing)
    for kind in EMPTY:
        assert kind() == kind()


def test_merging_with_itself_doubles():
    for thing in full():
        if hasattr(thing, "merge"):
            twin, expected = copy.copy(thing), copy.copy(thing)
            expected.merge(twin)
            thing.merge(thing)
            assert thing == expected


def test_any_bytes_are_a_total():
    import moistair

    rng = random(23)
    for thing in full():
        kind, order, data = thing.__reduce__()[1]
        for _ in range(20):
            damaged = moistair._core.restore_owned(kind, order, rng.bytes(len(data)))
            for name in dir(damaged):
                value = getattr(damaged, name)
                if not callable(value):
                    repr(value)
            if hasattr(damaged, "merge"):
                damaged.merge(thing)
            if isinstance(damaged, (Total, Periods)):
                damaged.add(time=np.arange(50.0), rate=1.0)
