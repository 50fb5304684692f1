"""One state: its values, its arguments, what it is as an object."""

import copy
import csv
import math
import pickle
from pathlib import Path

import moistair
import numpy as np
import pytest
from moistair import MoistAir
from support import FORMULATIONS, SEA_LEVEL, SECOND, bits

PUBLISHED = Path(__file__).resolve().parents[2] / "tests" / "published"


def air(**second):
    return MoistAir(dry_bulb=30.0, pressure=SEA_LEVEL, **(second or {"relative_humidity": 0.5}))


def rows(name):
    path = PUBLISHED / name
    if not path.exists():
        pytest.skip("the published tables are not part of a package installed without the repository")
    lines = path.read_text(encoding="utf-8").splitlines()
    declared = next(int(line.split(":")[1]) for line in lines if line.startswith("# rows:"))
    table = list(csv.DictReader(line for line in lines if not line.startswith("#")))
    assert len(table) == declared
    return table


def half_a_unit(text):
    return 0.5 * 10.0 ** -len(text.partition(".")[2])


def test_handbook_table_of_saturated_air():
    """ASHRAE Fundamentals 2021 ch. 1, Table 2.

    Its saturation pressures differ from those of IAPWS-95 and R10-06 by up to 2e-4. Its volumes and enthalpies lie up to 2.2e-5
    below; its molar mass of dry air, 28.966 g/mol against 28.96546 of G8-10, makes 1.9e-5 of that.
    """
    compared = 0
    for row in rows("handbook_table2_moist_air.csv"):
        t, ratio = float(row["t_C"]), float(row["Ws_kg_kg"])
        dry = MoistAir(dry_bulb=t, humidity_ratio=0.0, pressure=SEA_LEVEL)
        saturated = MoistAir(dry_bulb=t, degree_of_saturation=1.0, pressure=SEA_LEVEL)
        shift = 2e-4 * (1.0 + ratio / 0.622) * ratio
        mass = 2.2e-5
        checks = (
            (saturated.humidity_ratio, "Ws_kg_kg", 1.0, shift),
            (dry.specific_volume, "v_da_m3_kg", 1.0, mass * dry.specific_volume),
            (saturated.specific_volume, "v_s_m3_kgda", 1.0, (mass + 1.61 * shift) * saturated.specific_volume),
            (dry.specific_enthalpy, "h_da_kJ_kg", 1e3, mass * abs(dry.specific_enthalpy)),
            (saturated.specific_enthalpy, "h_s_kJ_kgda", 1e3, mass * abs(saturated.specific_enthalpy) + shift * 2.7e6),
        )
        for value, column, unit, slack in checks:
            published = float(row[column]) * unit
            allowed = half_a_unit(row[column]) * unit + slack
            assert abs(value - published) <= allowed, (t, column, value, published, allowed)
            compared += 1
    assert compared == 17 * 5


def test_properties_are_those_of_the_core():
    assert set(moistair.PROPERTIES) == {name for name in dir(MoistAir) if name in moistair.QUANTITIES}
    assert len(moistair.PROPERTIES) >= 23
    assert [moistair.QUANTITIES[name].code for name in moistair.PROPERTIES] == list(range(len(moistair.PROPERTIES)))


def test_values_are_plain_floats():
    state = air()
    for name in moistair.PROPERTIES:
        if name not in ("wet_bulb_over_ice", "frost_point"):
            assert type(getattr(state, name)) is float
    assert (state.status, state.failed, state.shape, state.size) == (0, 0, (), 1)


@pytest.mark.parametrize("formulation", FORMULATIONS)
@pytest.mark.parametrize("name", SECOND)
def test_every_second_property_leads_back(name, formulation):
    cold = name in ("wet_bulb_over_ice", "frost_point")
    t = -10.0 if cold else 30.0
    state = MoistAir(dry_bulb=t, relative_humidity=0.5, pressure=SEA_LEVEL, formulation=formulation)
    again = MoistAir(dry_bulb=t, pressure=SEA_LEVEL, formulation=formulation, **{name: getattr(state, name)})
    assert again.dry_bulb == t
    assert again.humidity_ratio == pytest.approx(state.humidity_ratio, rel=1e-9)
    assert again.formulation == formulation


def test_integers_and_numpy_scalars_are_numbers():
    state = MoistAir(dry_bulb=20, relative_humidity=np.float64(0.5), pressure=np.float32(100_000.0))
    assert state == MoistAir(dry_bulb=20.0, relative_humidity=0.5, pressure=100_000.0)
    assert MoistAir(dry_bulb=np.array(20.0), relative_humidity=np.array(0.5), pressure=np.int64(100_000)) == state


def test_exactly_one_second_property():
    with pytest.raises(TypeError, match="one of: relative_humidity"):
        MoistAir(dry_bulb=20.0, pressure=SEA_LEVEL)
    with pytest.raises(TypeError, match="wet_bulb and dew_point are given"):
        MoistAir(dry_bulb=20.0, pressure=SEA_LEVEL, wet_bulb=15.0, dew_point=12.0)
    with pytest.raises(TypeError):
        MoistAir(20.0, 0.5, SEA_LEVEL)
    with pytest.raises(TypeError):
        MoistAir(dry_bulb=20.0, relative_humidity=0.5)  # no silent pressure


def test_wrong_types_and_names():
    for wrong in ("20", None, object(), 1j, [[1.0], [1.0, 2.0]], ["a"], {"a": 1.0}):
        with pytest.raises(TypeError):
            MoistAir(dry_bulb=wrong, relative_humidity=0.5, pressure=SEA_LEVEL)
    with pytest.raises(ValueError, match="formulation"):
        air(relative_humidity=0.5, formulation="perfect")
    with pytest.raises(OverflowError):
        air(relative_humidity=10**400)


def test_properties_together():
    state = air()
    together = state.properties("wet_bulb", "dew_point", "density")
    assert list(together) == ["wet_bulb", "dew_point", "density"]
    assert together == {name: getattr(state, name) for name in together}
    assert state.properties() == {}
    with pytest.raises(TypeError, match="one state"):
        state.properties("wet_bulb", out={})
    with pytest.raises(TypeError):
        state.properties(3)


def test_object():
    state = air()
    assert state == air() and hash(state) == hash(air())
    assert state != air(relative_humidity=0.51) and state != "air"
    assert copy.copy(state) is state and copy.deepcopy(state) is state
    assert eval(repr(state), {"MoistAir": MoistAir}) == state
    with pytest.raises(AttributeError):
        state.dry_bulb = 3.0
    with pytest.raises(AttributeError):
        state.anything = 3.0
    with pytest.raises(TypeError):
        type("Derived", (MoistAir,), {})
    assert MoistAir[float].__origin__ is MoistAir


@pytest.mark.parametrize("protocol", range(2, pickle.HIGHEST_PROTOCOL + 1))
def test_pickle_keeps_every_bit(protocol):
    for state in (air(), air(humidity_ratio=0.0), air(relative_humidity=1.0, formulation="ideal_gas")):
        again = pickle.loads(pickle.dumps(state, protocol))
        assert again == state
        for name in ("dry_bulb", "humidity_ratio", "specific_enthalpy", "specific_volume", "wet_bulb"):
            assert bits(getattr(again, name)) == bits(getattr(state, name))


def test_negative_zero_is_zero_in_comparisons():
    a = MoistAir(dry_bulb=0.0, humidity_ratio=0.0, pressure=SEA_LEVEL)
    b = MoistAir(dry_bulb=-0.0, humidity_ratio=0.0, pressure=SEA_LEVEL)
    assert a == b and hash(a) == hash(b)
    assert math.copysign(1.0, b.dry_bulb) == -1.0  # a reading comes back bit for bit


def test_standard_atmosphere():
    """ASHRAE Fundamentals 2021 ch. 1, Table 1, which follows its Eq. (3), whose rounded constants shift it by up to 0.15 Pa."""
    table = [row for row in rows("handbook_examples.csv") if row["quantity"] == "p standard atmosphere"]
    assert len(table) >= 10
    for row in table:
        elevation = float(row["inputs"].removeprefix("Z_m="))
        assert abs(moistair.pressure_at_elevation(elevation) / 1e3 - float(row["value"])) <= half_a_unit(row["value"]) + 1.5e-4
    many = moistair.pressure_at_elevation([0, 1500, 20_000])
    assert many[0] == moistair.pressure_at_elevation(0.0) and np.isnan(many[2])
    assert moistair.pressure_at_elevation(5000.0, geometric=True) > moistair.pressure_at_elevation(5000.0)
    with pytest.raises(moistair.OutOfRangeError):
        moistair.pressure_at_elevation(np.array(20_000.0))


def test_versions():
    assert isinstance(moistair.NUMERICS_VERSION, int) and moistair.NUMERICS_VERSION >= 1
    assert moistair.__version__.count(".") == 2


def test_everything_public_is_documented_and_listed():
    for name in moistair.__all__:
        thing = getattr(moistair, name)
        if callable(thing):
            assert thing.__doc__, name
    for name in moistair.PROPERTIES:
        assert getattr(MoistAir, name).__doc__
