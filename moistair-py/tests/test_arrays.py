"""Arrays of states: broadcasting, types and layouts, bad rows, memory of the caller."""

import copy
import pickle

import moistair
import numpy as np
import pytest
from moistair import MoistAir
from support import FORMULATIONS, SEA_LEVEL, SECOND, grid, same_bits


def states(t, rh, p=SEA_LEVEL, **more):
    return MoistAir(dry_bulb=t, relative_humidity_over_liquid=rh, pressure=p, **more)


@pytest.mark.parametrize("formulation", FORMULATIONS)
def test_rows_are_scalar_calls_bit_for_bit(formulation):
    t, rh, p = grid(60, seed=1)
    many = states(t, rh, p, formulation=formulation)
    together = many.properties(*moistair.PROPERTIES)
    compared = 0
    for row in range(t.size):
        one = states(float(t[row]), float(rh[row]), float(p[row]), formulation=formulation)
        for name in moistair.PROPERTIES:
            try:
                expected = getattr(one, name)
            except moistair.NoValueError:
                expected = np.nan
            assert same_bits(together[name][row], expected), (name, row)
            compared += 1
    assert compared == 60 * len(moistair.PROPERTIES)
    for name in moistair.PROPERTIES:
        assert same_bits(getattr(many, name), together[name])
    assert many.failed == 0


@pytest.mark.parametrize("name", SECOND)
def test_every_second_property_takes_arrays(name):
    t = np.array([-15.0, -12.0])
    air = MoistAir(dry_bulb=t, relative_humidity=0.6, pressure=SEA_LEVEL)
    again = MoistAir(dry_bulb=t, pressure=SEA_LEVEL, **{name: getattr(air, name)})
    assert again.failed == 0
    np.testing.assert_allclose(again.humidity_ratio, air.humidity_ratio, rtol=1e-8)


def test_broadcasting_is_numpys():
    t = np.linspace(0.0, 40.0, 3)[:, None]
    rh = np.linspace(0.1, 0.9, 4)
    air = states(t, rh)
    assert air.shape == (3, 4) and air.size == 12 and air.wet_bulb.shape == (3, 4) and air.status.shape == (3, 4)
    assert np.array_equal(air.dry_bulb, np.broadcast_to(t, (3, 4)))
    deep = states(t[:, :, None], rh[:, None], np.array([90e3, 100e3]))
    assert deep.shape == (3, 4, 2)
    assert same_bits(deep.density[2, 1, 0], states(40.0, float(rh[1]), 90e3).density)


def test_shapes_that_do_not_match():
    with pytest.raises(ValueError, match=r"dry_bulb \(3,\), relative_humidity_over_liquid \(2,\)"):
        states(np.zeros(3), np.zeros(2))
    huge = np.broadcast_to(0.5, (1, 2**40))
    with pytest.raises((ValueError, MemoryError, OverflowError)):
        states(huge.T, huge)


def test_dimensions():
    assert states(np.array(20.0), 0.5).shape == ()
    assert states([20.0], 0.5).shape == (1,)
    assert states(np.zeros((1, 1)), 0.5).wet_bulb.shape == (1, 1)
    many = (1,) * 30 + (2, 3)
    assert states(np.zeros(many), 0.5).density.shape == many
    if np.lib.NumpyVersion(np.__version__) >= "2.0.0":
        with pytest.raises(ValueError, match="shapes do not match"):
            states(np.zeros((1,) * 40), 0.5)


def test_nothing_is_fine():
    empty = states(np.zeros((0, 3)), 0.5)
    assert empty.shape == (0, 3) and empty.size == 0 and empty.failed == 0
    assert empty.wet_bulb.shape == (0, 3) and empty.status.dtype == np.int32
    assert empty.properties("density")["density"].shape == (0, 3)
    assert empty == pickle.loads(pickle.dumps(empty))


def layouts(values):
    """The same numbers in every layout that NumPy knows."""
    n = len(values)
    yield "list", list(values)
    yield "tuple", tuple(values)
    yield "strided", np.repeat(values, 3)[::3]
    yield "reversed", np.ascontiguousarray(values[::-1])[::-1]
    yield "swapped bytes", values.astype(values.dtype.newbyteorder())
    record = np.zeros(n, dtype=[("a", "i4"), ("b", "f8")])
    record["b"] = values
    yield "packed record", record["b"]
    raw = np.zeros(8 * n + 1, dtype=np.uint8)[1:].view(np.float64)
    raw[:] = values
    assert not raw.flags.aligned
    yield "unaligned", raw
    frozen = values.copy()
    frozen.flags.writeable = False
    yield "read-only", frozen
    yield "float128", values.astype(np.longdouble)
    yield "masked without a mask", np.ma.array(values)
    yield "column of a table", np.stack([values, values], axis=1)[:, 1]
    yield "memoryview", memoryview(np.ascontiguousarray(values))


def test_layouts():
    t = np.linspace(-20.0, 50.0, 7)
    expected = states(t, 0.4).specific_enthalpy
    seen = 0
    for name, layout in layouts(t):
        assert same_bits(states(layout, 0.4).specific_enthalpy, expected), name
        seen += 1
    assert seen == 12
    table = np.asfortranarray(np.stack([t, t + 1.0, t + 2.0]))
    assert same_bits(states(table, 0.4).density, states(np.ascontiguousarray(table), 0.4).density)
    assert same_bits(states(table.T, 0.4).density, states(table, 0.4).density.T)


def test_other_number_types():
    for kind in (np.float32, np.float16, np.int8, np.int64, np.uint16):
        t = np.array([10, 20, 30]).astype(kind)
        air = states(t, 0.5)
        assert air.wet_bulb.dtype == np.float64
        assert same_bits(air.wet_bulb, states(t.astype(float), 0.5).wet_bulb)
    for wrong in (np.array(["a"]), np.array([1j]), np.array([None]), np.array(["2020-01-01"], dtype="M8[s]")):
        with pytest.raises(TypeError, match="dry_bulb"):
            states(wrong, 0.5)


def test_masked_is_missing():
    air = states(np.ma.array([10.0, 20.0], mask=[False, True]), 0.5)
    assert air.status.tolist() == [0, 201] and np.isnan(air.wet_bulb[1])
    assert states(np.ma.array([10, 20], mask=[True, False]), 0.5).status.tolist() == [201, 0]


def test_a_bad_row_costs_only_itself():
    t = np.array([20.0, np.nan, 20.0, 900.0, 20.0, np.inf])
    rh = np.array([0.5, 0.5, 0.0, 0.5, 55.0, 0.5])
    air = states(t, rh)
    assert air.status.tolist() == [0, 201, 0, 202, 202, 201] and air.failed == 4
    good = air.status == 0
    for name in moistair.PROPERTIES:
        assert np.isnan(getattr(air, name)[~good]).all(), name
    # Dry air is a state, only without a dew point.
    assert np.isfinite(air.specific_enthalpy[2]) and np.isnan(air.dew_point[2])
    assert same_bits(air.wet_bulb[0], states(20.0, 0.5).wet_bulb)


def test_nan_is_one_constant():
    rows = np.array([np.nan, -np.nan, np.inf, 900.0])
    assert set(states(rows, 0.5).wet_bulb.view(np.uint64).tolist()) == {0x7FF8000000000000}


def test_states_do_not_change_with_what_they_were_made_of():
    t = np.array([10.0, 20.0])
    air = states(t, 0.5)
    before = air.wet_bulb
    t[:] = 50.0
    air.dry_bulb[:] = 50.0
    air.status[:] = 1
    assert same_bits(air.wet_bulb, before) and air.status.tolist() == [0, 0]


def test_out():
    air = states(np.linspace(0.0, 40.0, 6).reshape(2, 3), 0.5)
    expected = air.properties("wet_bulb", "density")
    out = air.properties("wet_bulb", "density")
    addresses = {name: array.ctypes.data for name, array in out.items()}
    for array in out.values():
        array[:] = -1.0
    assert air.properties("wet_bulb", "density", out=out) is out
    assert addresses == {name: array.ctypes.data for name, array in out.items()}
    for name in expected:
        assert same_bits(out[name], expected[name])
    other = {
        "wet_bulb": np.zeros((2, 3), np.float32),
        "density": np.zeros((4, 6))[::2, ::2],
        "more": np.zeros(1),
    }
    air.properties("wet_bulb", "density", out=other)
    assert np.array_equal(other["wet_bulb"], expected["wet_bulb"].astype(np.float32))
    assert same_bits(other["density"], expected["density"])


def test_out_overwrites_rows_without_a_value():
    for air in (states(np.array([20.0, 900.0]), 0.0), pickle.loads(pickle.dumps(states(np.array([20.0, 900.0]), 0.0)))):
        out = {"dew_point": np.zeros(2), "density": np.zeros(2)}
        air.properties(*out, out=out)
        assert np.isnan(out["dew_point"]).all() and np.isnan(out["density"]).tolist() == [False, True]


def test_out_that_does_not_fit():
    air = states(np.zeros(3), 0.5)

    def refused(error, array, *names):
        with pytest.raises(error):
            air.properties(*(names or ("wet_bulb",)), out={"wet_bulb": array, "density": array})

    frozen = np.zeros(3)
    frozen.flags.writeable = False
    refused(ValueError, frozen)
    refused(ValueError, np.zeros(2))
    refused(ValueError, np.zeros((3, 1)))
    refused(TypeError, np.zeros(3, dtype=int))
    refused(TypeError, [0.0, 0.0, 0.0])
    refused(ValueError, np.zeros(3), "wet_bulb", "density")  # one memory for two results
    with pytest.raises(ValueError, match="dew_point"):
        air.properties("dew_point", out={})


def test_object():
    air = states(np.array([20.0, np.nan, 30.0]), 0.5)
    again = pickle.loads(pickle.dumps(air))
    assert again == air and hash(again) == hash(air) and again.failed == 1
    for name in moistair.PROPERTIES:
        assert same_bits(getattr(again, name), getattr(air, name)), name
    assert copy.deepcopy(air) is air
    assert air != states(np.array([20.0, np.nan, 30.1]), 0.5)
    assert air != states(np.array([[20.0, np.nan, 30.0]]), 0.5)
    assert states([20.0], 0.5) != states(20.0, 0.5)
    assert repr(air) == "<MoistAir array: shape=(3,), failed=1, formulation='real_gas'>"


def test_unpickling_refuses_nonsense():
    restore = moistair._core.restore_state
    column, status = np.zeros(3), np.zeros(3, np.int32)
    for wrong in (
        (7, (3,), column, column, column, status),
        (0, (4,), column, column, column, status),
        (0, (2**40, 2**40), column, column, column, status),
        (0, (3,), column, column[:2], column, status),
        (0, (), 20.0, SEA_LEVEL, 3.0, 0),
    ):
        with pytest.raises(ValueError):
            restore(*wrong)
    # Numbers that make no state are rows without a value.
    assert np.isnan(restore(0, (3,), column + 900.0, column, column, status).density).all()
