"""Threads and forks: the interpreter lock is free while the core computes, and nothing of it outlives a call."""

import multiprocessing
import sys
import threading
import time
from concurrent.futures import ThreadPoolExecutor

import numpy as np
import pytest
from moistair import MoistAir
from moistair.process import AirStream, sensible
from support import SEA_LEVEL, grid, same_bits


def wet_bulbs(t, rh, p):
    return MoistAir(dry_bulb=t, relative_humidity_over_liquid=rh, pressure=p).wet_bulb


def test_threads_share_inputs_and_agree():
    t, rh, p = grid(500, seed=2)
    expected = wet_bulbs(t, rh, p)
    with ThreadPoolExecutor(8) as pool:
        results = list(pool.map(lambda _: wet_bulbs(t, rh, p), range(32)))
    assert all(same_bits(result, expected) for result in results)


def test_threads_share_a_state():
    t, rh, p = grid(300, seed=3)
    air = MoistAir(dry_bulb=t, relative_humidity_over_liquid=rh, pressure=p)
    expected = air.properties("dew_point", "density")
    with ThreadPoolExecutor(8) as pool:
        results = list(pool.map(lambda _: air.properties("dew_point", "density"), range(32)))
    for result in results:
        assert all(same_bits(result[name], expected[name]) for name in expected)


@pytest.mark.parametrize("what", ["states", "processes"])
def test_other_threads_run_meanwhile(what):
    t, rh, p = (np.resize(column, 20_000) for column in grid(1000, seed=4))
    air = MoistAir(dry_bulb=t, relative_humidity_over_liquid=rh, pressure=p)
    stream = AirStream(air, dry_air_flow=1.0)
    jobs = {
        "states": lambda: air.wet_bulb,
        "processes": lambda: sensible.with_heat(stream, heat=1e3),
    }
    ticks, done = [], threading.Event()

    def work():
        jobs[what]()
        done.set()

    worker = threading.Thread(target=work)
    worker.start()
    while not done.is_set():
        ticks.append(time.perf_counter())
        time.sleep(0.0005)
    worker.join()
    # With the lock held throughout, this loop would get through once or twice.
    assert len(ticks) > 5


def test_writing_to_one_memory_from_two_threads_is_refused_or_right():
    t, rh, p = grid(3000, seed=5)
    air = MoistAir(dry_bulb=t, relative_humidity_over_liquid=rh, pressure=p)
    out = air.properties("wet_bulb")
    expected = out["wet_bulb"].copy()
    refused = []

    def write(_):
        try:
            air.properties("wet_bulb", out=out)
        except ValueError as error:
            refused.append(str(error))

    with ThreadPoolExecutor(4) as pool:
        list(pool.map(write, range(16)))
    assert same_bits(out["wet_bulb"], expected)
    assert all("cannot be used" in message for message in refused)


def _in_child(queue, t, rh):
    queue.put(wet_bulbs(t, rh, SEA_LEVEL).tolist())


@pytest.mark.skipif(sys.platform == "win32" or "fork" not in multiprocessing.get_all_start_methods(), reason="no fork here")
@pytest.mark.filterwarnings("ignore:.*multi-threaded.*fork.*:DeprecationWarning")
def test_a_forked_child_computes():
    t, rh, _ = grid(200, seed=6)
    expected = wet_bulbs(t, rh, SEA_LEVEL)  # before the fork
    context = multiprocessing.get_context("fork")
    queue = context.Queue()
    children = [context.Process(target=_in_child, args=(queue, t, rh)) for _ in range(3)]
    for child in children:
        child.start()
    for _ in children:
        assert same_bits(queue.get(timeout=60), expected)
    for child in children:
        child.join(60)
        assert child.exitcode == 0
