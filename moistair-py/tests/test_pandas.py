"""Columns of pandas: taken by position, never against their labels."""

import numpy as np
import pandas as pd
import pytest
from moistair import MoistAir
from moistair.account import Rule, Total
from moistair.process import AirStream
from support import SEA_LEVEL, same_bits

HOURS = pd.date_range("2024-01-01", periods=3, freq="h")
T = pd.Series([20.0, 21.0, 22.0], index=HOURS)
RH = pd.Series([0.5, 0.6, 0.7], index=HOURS)


def states(t, rh):
    return MoistAir(dry_bulb=t, relative_humidity=rh, pressure=SEA_LEVEL)


def test_series_are_their_arrays():
    air = states(T, RH)
    assert type(air.wet_bulb) is np.ndarray and air.shape == (3,)
    assert same_bits(air.wet_bulb, states(T.to_numpy(), RH.to_numpy()).wet_bulb)
    frame = pd.DataFrame({"t": T, "rh": RH}).assign(wet_bulb=air.wet_bulb)
    assert same_bits(frame["wet_bulb"], air.wet_bulb) and frame.index.equals(HOURS)


def test_missing_of_any_kind_is_nan():
    for column in (T.astype("Float64"), T.astype("Int64"), T.astype("float32")):
        column = column.copy()
        column.iloc[1] = None
        assert states(column, 0.5).status.tolist() == [0, 201, 0]


def test_frames_broadcast_as_arrays():
    frame = pd.DataFrame({"a": T, "b": T + 5.0})
    assert states(frame, RH.to_numpy()[:, None]).shape == (3, 2)
    assert states(frame, pd.Series([0.5, 0.6], index=["a", "b"])).shape == (3, 2)


@pytest.mark.parametrize(
    ("t", "rh"),
    [
        (T, RH[::-1]),
        (T, RH.reset_index(drop=True)),
        (T.to_frame("a"), RH.to_frame("b")),
        (pd.DataFrame({"a": T, "b": T}), pd.Series([0.5, 0.6], index=["b", "a"])),
    ],
)
def test_other_labels_are_refused(t, rh):
    with pytest.raises(ValueError, match="dry_bulb and relative_humidity have different labels; align them first"):
        states(t, rh)
    assert states(t, rh.to_numpy()).failed == 0


def test_labels_of_processes_and_totals():
    by_row = T.reset_index(drop=True)
    with pytest.raises(ValueError, match="different labels"):
        AirStream.from_standard_volume_flow(states(T, RH), volume_flow=T, reference_density=by_row)
    with pytest.raises(ValueError, match="time and rate have different labels"):
        Total(rule=Rule.STEP, longest_step=90.0).add(time=by_row, rate=T)


def test_lengths_are_a_matter_of_shapes():
    with pytest.raises(ValueError, match=r"shapes do not match: dry_bulb \(3,\), relative_humidity \(2,\)"):
        states(T, RH[:2])


@pytest.mark.parametrize("column", [T.astype(object), T.astype(str), T.astype("string"), [20.0, None]])
def test_text_says_what_to_do(column):
    with pytest.raises(TypeError, match="dry_bulb must be .*turn it into floats first"):
        states(column, 0.5)


@pytest.mark.parametrize("time", [HOURS, HOURS - HOURS[0], HOURS.to_numpy()])
def test_instants_say_what_to_do(time):
    total = Total(rule=Rule.STEP, longest_step=3600.0)
    with pytest.raises(TypeError, match="time must be .*count seconds from a fixed instant"):
        total.add(time=time, rate=T)
    assert total == Total(rule=Rule.STEP, longest_step=3600.0)
    assert total.add(time=(HOURS - HOURS[0]) / np.timedelta64(1, "s"), rate=T.to_numpy()).tolist() == [0, 1, 1]
    assert total.total == (20.0 + 21.0) * 3600.0
