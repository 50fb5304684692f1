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


def test_exactly_two_properties_beside_pressure():
    with pytest.raises(TypeError, match="one of relative_humidity, .*; given: dry_bulb$"):
        MoistAir(dry_bulb=20.0, pressure=SEA_LEVEL)
    with pytest.raises(TypeError, match="given: dry_bulb, wet_bulb, dew_point$"):
        MoistAir(dry_bulb=20.0, pressure=SEA_LEVEL, wet_bulb=15.0, dew_point=12.0)
    with pytest.raises(TypeError, match="given: wet_bulb$"):
        MoistAir(pressure=SEA_LEVEL, wet_bulb=15.0)
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


def test_elevation_and_temperature_of_the_standard_atmosphere():
    """ISO 2533:1975 and the US Standard Atmosphere 1976, figures from memory; at 20 km there is no value."""
    table = [row for row in rows("standard_atmosphere.csv") if row["quantity"] in ("T", "p") and "20000" not in row["id"]]
    compared = 0
    for row in table:
        geometric = row["id"].startswith("US76")
        altitude, value = float(row["inputs"].partition("=")[2]), float(row["value"])
        unit = 0.5 * 10.0 ** (math.floor(math.log10(value)) - int(row["sig"]) + 1)
        if row["quantity"] == "T":
            assert abs(moistair.temperature_at_elevation(altitude, geometric=geometric) + 273.15 - value) <= 1.000001 * unit
        else:
            found = moistair.elevation_at_pressure(value, geometric=geometric)
            # half a unit of the print, over the least slope of the layer, 3.6 Pa/m, and the gas constant's 1.1e-6
            assert abs(found - altitude) <= (unit + 1.1e-6 * value) / 3.5
        compared += 1
    assert compared == 28
    many = moistair.elevation_at_pressure([101_325.0, 84_556.0, 300_000.0])
    assert many[1] == moistair.elevation_at_pressure(84_556.0) and np.isnan(many[2])
    assert moistair.elevation_at_pressure(101_325.0) == 0.0
    with pytest.raises(moistair.OutOfRangeError) as caught:
        moistair.elevation_at_pressure(np.array(300_000.0))
    assert caught.value.quantity == "pressure" and 177e3 < caught.value.maximum < 178e3


@pytest.mark.parametrize("formulation", FORMULATIONS)
def test_transport(formulation):
    """Air at 300 K of vanishing density: Lemmon & Jacobsen 2004, Table V. Numbers of room air: common practice, no source."""
    thin = MoistAir(dry_bulb=26.85, humidity_ratio=0.0, pressure=20_000.0, formulation=formulation)
    assert thin.dynamic_viscosity == pytest.approx(18.5230e-6, rel=1e-3)
    assert thin.thermal_conductivity == pytest.approx(26.3529e-3, rel=1e-3)
    room = MoistAir(dry_bulb=20.0, relative_humidity=0.5, pressure=SEA_LEVEL, formulation=formulation)
    assert room.prandtl_number == pytest.approx(0.71, abs=0.02) and room.lewis_number == pytest.approx(0.85, abs=0.03)
    assert room.schmidt_number == pytest.approx(room.prandtl_number * room.lewis_number, rel=1e-14)
    assert room.vapor_diffusivity == pytest.approx(21.78e-6 * (293.15 / 273.15) ** 1.81, rel=1e-12)


@pytest.mark.parametrize("formulation", FORMULATIONS)
@pytest.mark.parametrize(("bulb", "coefficient"), [("water", 6.53e-4), ("ice", 5.75e-4)])
def test_psychrometer(bulb, coefficient, formulation):
    cold = {"water": 0.0, "ice": -20.0}[bulb]
    dry, wet = np.array([10.0, 12.0, 15.0]) + cold, np.array([9.0, 10.5, 11.0]) + cold
    common = {"pressure": SEA_LEVEL, "bulb": bulb, "formulation": formulation}
    many = MoistAir.from_psychrometer(dry_bulb=dry, wet_bulb=wet, **common)
    over = {"dew_point": wet} if bulb == "water" else {"frost_point": wet}
    saturated = MoistAir(dry_bulb=wet, pressure=SEA_LEVEL, formulation=formulation, **over)
    rise = 1.0 + 0.000944 * wet if bulb == "water" else 1.0
    expected = saturated.vapor_pressure - coefficient * rise * SEA_LEVEL * (dry - wet)
    assert many.vapor_pressure == pytest.approx(expected, rel=1e-9)
    assert many.psychrometer_reading(bulb=bulb) == pytest.approx(wet, abs=1e-9)
    for row in range(3):
        one = MoistAir.from_psychrometer(dry_bulb=float(dry[row]), wet_bulb=float(wet[row]), **common)
        assert bits(one.humidity_ratio) == bits(many.humidity_ratio[row])
        assert type(one.psychrometer_reading(bulb=bulb)) is float
    screen = many.psychrometer_reading(bulb=bulb, coefficient=[8e-4, 8e-4, 5.0])
    assert (screen[:2] > wet[:2]).all() and np.isnan(screen[2])
    with pytest.raises(moistair.UnattainableError) as caught:
        MoistAir.from_psychrometer(dry_bulb=10.0, wet_bulb=10.5, pressure=SEA_LEVEL, formulation=formulation)
    assert (caught.value.quantity, caught.value.maximum) == ("psychrometer_wet_bulb", 10.0)
    none = MoistAir.from_psychrometer(dry_bulb=[10.0], wet_bulb=[30.0], pressure=SEA_LEVEL, formulation=formulation)
    assert (none.failed, none.formulation, none.status.tolist()) == (1, formulation, [203])
    with pytest.raises(ValueError, match="'water' or 'ice'"):
        many.psychrometer_reading(bulb="snow")


def test_other_pressures():
    outdoor = MoistAir(dry_bulb=20.0, relative_humidity=0.5, pressure=100e3)
    line = outdoor.at_temperature_and_pressure(dry_bulb=80.0, pressure=800e3)
    assert (line.humidity_ratio, line.pressure, line.dry_bulb) == (outdoor.humidity_ratio, 800e3, 80.0)
    assert outdoor.dew_point_at(800e3) == pytest.approx(line.dew_point, abs=1e-9)
    assert outdoor.at_pressure(100e3) == outdoor
    with pytest.raises(moistair.UnattainableError):
        outdoor.at_pressure(800e3)
    many = outdoor.dew_point_at([100e3, 800e3, 1.0])
    assert many[1] == outdoor.dew_point_at(800e3) and np.isnan(many[2])
    after = moistair.saturation_temperature_after
    there = after(frost_point=-40.0, pressure=800e3, wanted="frost_point", new_pressure=100e3)
    assert after(frost_point=there, pressure=100e3, wanted="frost_point", new_pressure=800e3) == pytest.approx(-40.0, abs=1e-9)
    with pytest.raises(TypeError, match="exactly one"):
        after(dew_point=1.0, frost_point=0.0, pressure=800e3, wanted="dew_point", new_pressure=100e3)
    with pytest.raises(moistair.NoValueError):
        after(dew_point=3.0, pressure=1.1e6, wanted="dew_point", new_pressure=20e3)


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


def test_helmholtz_formulation_reaches_further():
    """IAPWS G8-10 Table 13 at 300 and 400 K, enthalpy of moist air; and what the real gas refuses."""
    table = [row for row in rows("g8_10_tables13_14_15.csv") if row["quantity"].endswith("[humid air]")]
    for kelvins in (300, 400):
        point = {row["quantity"].split()[0]: row for row in table if f"T_K={kelvins};" in row["inputs"]}
        dry_air = float(point["p"]["inputs"].split(";")[0].removeprefix("A="))
        state = MoistAir(
            dry_bulb=kelvins - 273.15,
            specific_humidity=1.0 - dry_air,
            pressure=float(point["p"]["value"]),
            formulation="helmholtz",
        )
        assert dry_air * state.specific_enthalpy == pytest.approx(float(point["h"]["value"]), rel=5e-9)
        # The mass fraction of dry air has nine digits: those of the water are worth 3e-3 J/kg at 300 K.
        assert state.chemical_potential_of_water == pytest.approx(float(point["mu_W"]["value"]), abs=3e-3)
    with pytest.raises(moistair.OutOfRangeError) as caught:
        MoistAir(dry_bulb=180.0, relative_humidity=0.5, pressure=4e6)
    assert (caught.value.minimum, caught.value.maximum) == moistair.limits("dry_bulb")
    compressed = MoistAir(dry_bulb=180.0, relative_humidity=0.5, pressure=4e6, formulation="helmholtz")
    assert 140.0 < compressed.dew_point < 180.0
    with pytest.raises(moistair.OutOfRangeError) as caught:
        MoistAir(dry_bulb=180.0, relative_humidity=0.5, pressure=6e6, formulation="helmholtz")
    assert (caught.value.minimum, caught.value.maximum) == moistair.limits("pressure", "helmholtz")


def test_limits_of_every_quantity():
    for name, quantity in moistair.QUANTITIES.items():
        for formulation in FORMULATIONS:
            low, high = moistair.limits(name, formulation)
            wider = formulation == "helmholtz"
            assert low <= quantity.minimum and high >= quantity.maximum
            assert wider or (low, high) == (quantity.minimum, quantity.maximum)
    with pytest.raises(moistair.UnknownNameError, match="QUANTITIES"):
        moistair.limits("warmth")
    with pytest.raises(ValueError, match="'helmholtz'"):
        moistair.limits("pressure", "perfect")


@pytest.mark.parametrize("formulation", FORMULATIONS)
def test_gibbs_energy_is_that_of_the_components(formulation):
    """h − T s = μ_a + W μ_w, and fugacity near the vapor pressure."""
    state = air(relative_humidity=0.7, formulation=formulation)
    gibbs = state.specific_enthalpy - 303.15 * state.specific_entropy
    parts = state.chemical_potential_of_dry_air + state.humidity_ratio * state.chemical_potential_of_water
    assert gibbs == pytest.approx(parts, abs=1e-8)
    assert state.fugacity_of_water == pytest.approx(state.vapor_pressure, rel=5e-3)
    assert state.specific_heat_at_constant_volume < state.specific_heat
    dry = air(humidity_ratio=0.0, formulation=formulation)
    assert dry.fugacity_of_water == 0.0
    with pytest.raises(moistair.NoValueError):
        dry.chemical_potential_of_water
