"""Partial derivatives: the same numbers one by one and as arrays, and what they must be."""

import math
import pickle

import moistair
import numpy as np
import pytest
from moistair import MoistAir
from support import FORMULATIONS, SEA_LEVEL, SECOND, grid, same_bits


@pytest.mark.parametrize("formulation", FORMULATIONS)
@pytest.mark.parametrize("second", SECOND)
def test_arrays_hold_the_bits_of_single_states(second, formulation):
    t, rh, p = grid(40, 11)
    column = MoistAir(dry_bulb=t, relative_humidity_over_liquid=rh, pressure=p, formulation=formulation)
    slopes = column.derivatives(*moistair.PROPERTIES, second=second)
    compared = 0
    for row in range(t.size):
        air = MoistAir(
            dry_bulb=t[row], relative_humidity_over_liquid=rh[row], pressure=p[row], formulation=formulation
        )
        for name in moistair.PROPERTIES:
            try:
                one = air.derivatives(name, second=second)[name]
            except moistair.NoValueError:
                one = moistair.PropertyDerivatives(math.nan, math.nan, math.nan, math.nan)
            else:
                assert one.value == getattr(air, name)
                compared += 1
            for part in ("value", "by_dry_bulb", "by_second", "by_pressure"):
                assert same_bits(getattr(slopes[name], part)[row], getattr(one, part)), (name, part)
    assert compared > 100


def test_against_a_difference():
    def dew_point(t, rh, p):
        return MoistAir(dry_bulb=t, relative_humidity=rh, pressure=p).dew_point

    air = MoistAir(dry_bulb=24.0, relative_humidity=0.5, pressure=SEA_LEVEL)
    slopes = air.derivatives("dew_point", second="relative_humidity")["dew_point"]
    difference = (dew_point(24.01, 0.5, SEA_LEVEL) - dew_point(23.99, 0.5, SEA_LEVEL)) / 0.02
    assert slopes.by_dry_bulb == pytest.approx(difference, rel=1e-6)
    difference = (dew_point(24.0, 0.501, SEA_LEVEL) - dew_point(24.0, 0.499, SEA_LEVEL)) / 0.002
    assert slopes.by_second == pytest.approx(difference, rel=1e-5)


def test_shapes_and_records():
    air = MoistAir(dry_bulb=[[20.0, 25.0, 900.0]], relative_humidity=0.5, pressure=SEA_LEVEL)
    slopes = air.derivatives("specific_enthalpy", second="relative_humidity")["specific_enthalpy"]
    assert slopes.by_second.shape == (1, 3) and np.isnan(slopes.by_second[0, 2])
    assert slopes == air.derivatives("specific_enthalpy", second="relative_humidity")["specific_enthalpy"]
    assert pickle.loads(pickle.dumps(slopes)) == slopes
    one = MoistAir(dry_bulb=20.0, relative_humidity=0.5, pressure=SEA_LEVEL)
    itself = one.derivatives("relative_humidity", second="relative_humidity")["relative_humidity"]
    assert itself == moistair.PropertyDerivatives(one.relative_humidity, 0.0, 1.0, 0.0)


def test_refusals():
    air = MoistAir(dry_bulb=20.0, humidity_ratio=0.0, pressure=SEA_LEVEL)
    for names, second, error in (
        (("warmth",), "humidity_ratio", moistair.UnknownNameError),
        (("dew_point",), "dry_bulb", moistair.UnknownNameError),
        (("dew_point",), "warmth", moistair.UnknownNameError),
        ((3,), "humidity_ratio", TypeError),
        (("dew_point",), "humidity_ratio", moistair.NoValueError),
        (("wet_bulb",), "dew_point", moistair.NoValueError),
        (("specific_entropy",), "humidity_ratio", moistair.NoValueError),
    ):
        with pytest.raises(error):
            air.derivatives(*names, second=second)
