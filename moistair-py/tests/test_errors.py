"""Every exception class is raised by something, and carries what it should."""

import pickle

import moistair
import pytest
from moistair import MoistAir
from moistair.process import AirStream, coil, mixing, sensible
from support import SEA_LEVEL


def stream(t=30.0, rh=0.5, flow=1.0, **more):
    return AirStream(MoistAir(dry_bulb=t, relative_humidity=rh, pressure=SEA_LEVEL, **more), dry_air_flow=flow)


RAISED = {
    "UnknownNameError": (lambda: stream().air.properties("warmth"), 102, None),
    "NotFiniteError": (lambda: stream(t=float("nan")), 201, "dry_bulb"),
    "OutOfRangeError": (lambda: stream(t=900.0), 202, "dry_bulb"),
    "UnattainableError": (lambda: MoistAir(dry_bulb=20.0, humidity_ratio=0.5, pressure=SEA_LEVEL), 203, "humidity_ratio"),
    "UndeterminedError": (
        lambda: MoistAir(dew_point=10.0, humidity_ratio=0.008, pressure=SEA_LEVEL),
        209,
        "humidity_ratio",
    ),
    "ProcessError": (lambda: mixing.adiabatic(stream(), stream(formulation="ideal_gas")), 205, None),
    "InfeasibleError": (
        lambda: sensible.to_temperature(stream(), leaving_temperature=-20.0),
        301,
        "leaving_temperature",
    ),
    "NoValueError": (
        lambda: MoistAir(dry_bulb=20.0, humidity_ratio=0.0, pressure=SEA_LEVEL).dew_point,
        310,
        "dew_point",
    ),
}


@pytest.mark.parametrize("name", RAISED)
def test_raised(name):
    call, code, quantity = RAISED[name]
    with pytest.raises(moistair.MoistAirError) as caught:
        call()
    error = caught.value
    assert type(error).__name__ == name and type(error).__module__ == "moistair"
    assert isinstance(error, ValueError)
    assert (error.code, error.quantity) == (code, quantity)
    again = pickle.loads(pickle.dumps(error))
    assert type(again) is type(error) and str(again) == str(error) and vars(again) == vars(error)


def test_every_exported_class_is_tested():
    exported = {name for name in moistair.__all__ if name.endswith("Error")}
    assert exported == set(RAISED) | {"MoistAirError"}


def test_every_code_of_the_core_has_its_class():
    kinds = {code: type(moistair._errors.from_parts(code, "")).__name__ for code in (*range(100, 330),)}
    assert set(kinds.values()) == set(RAISED) | {"MoistAirError"}
    assert kinds[310] == kinds[313] == "NoValueError" and kinds[207] == "ProcessError"


def test_limits_and_likely_slips_are_told():
    with pytest.raises(moistair.OutOfRangeError, match="percentage") as caught:
        stream(rh=38.0)
    error = caught.value
    assert (error.value, error.minimum, error.maximum) == (38.0, 0.0, moistair.QUANTITIES["relative_humidity"].maximum)
    with pytest.raises(moistair.OutOfRangeError, match="kilopascals"):
        MoistAir(dry_bulb=20.0, relative_humidity=0.5, pressure=101.325)
    with pytest.raises(moistair.UnattainableError) as caught:
        MoistAir(dry_bulb=20.0, humidity_ratio=0.5, pressure=SEA_LEVEL)
    assert caught.value.minimum == 0.0 and 0.014 < caught.value.maximum < 0.015


def test_process_errors():
    for call, code in (
        (lambda: mixing.adiabatic(), 207),
        (lambda: sensible.with_heat(stream(flow=0.0), heat=1e3), 207),
        (lambda: coil.to_state(stream(), leaving=stream(10.0, 0.9, formulation="ideal_gas").air), 205),
    ):
        with pytest.raises(moistair.ProcessError) as caught:
            call()
        assert caught.value.code == code


def test_fractions_are_told_without_a_unit():
    with pytest.raises(moistair.OutOfRangeError, match="^relative humidity 38 is outside 0 to 1.6; "):
        stream(rh=38.0)


def test_names_of_properties_say_what_to_do():
    with pytest.raises(moistair.UnknownNameError, match="warmth is no property of a state; moistair.PROPERTIES lists them"):
        stream().air.properties("warmth")
    with pytest.raises(TypeError, match=r"strings, one argument each, .* not <class 'list'>"):
        stream().air.properties(["wet_bulb", "dew_point"])
