"""States from two properties of which neither is the dry bulb."""

import itertools

import moistair
import numpy as np
import pytest
from moistair import MoistAir
from support import FORMULATIONS, SEA_LEVEL, SECOND, grid, same_bits

VAPOR = ("humidity_ratio", "specific_humidity", "water_mole_fraction", "vapor_pressure", "dew_point", "frost_point")
HUMIDITY = ("relative_humidity", "relative_humidity_over_liquid", "degree_of_saturation")
WET_BULB = ("wet_bulb", "wet_bulb_over_liquid", "wet_bulb_over_ice")
ENTHALPY = ("specific_enthalpy",)

OFFERED = (
    *itertools.product(VAPOR, (*HUMIDITY, *WET_BULB, *ENTHALPY)),
    *itertools.product(HUMIDITY, (*WET_BULB, *ENTHALPY)),
)


def by(first, a, second, b, pressure=SEA_LEVEL, **more):
    return MoistAir(**{first: a, second: b, "pressure": pressure, **more})


@pytest.mark.parametrize("formulation", FORMULATIONS)
@pytest.mark.parametrize(("first", "second"), OFFERED)
def test_comes_back_in_one_and_in_arrays(first, second, formulation):
    t, rh, p = grid(60, 12)
    air = MoistAir(dry_bulb=t, relative_humidity_over_liquid=rh, pressure=p, formulation=formulation)
    a, b = getattr(air, first), getattr(air, second)
    back = by(first, a, second, b, p, formulation=formulation)
    # Near the melting temperature a wet bulb may be over the other surface.
    clear = ~np.isnan(a) & ~np.isnan(b) & (np.abs(b) > 1.0 if second == "wet_bulb" else True)
    assert clear.sum() >= 5
    assert np.array_equal(back.status == 0, ~np.isnan(back.dry_bulb))
    assert np.all(np.abs(back.dry_bulb - t)[clear] < 1e-7)
    for row in np.flatnonzero(clear)[:10]:
        one = by(first, a[row], second, b[row], p[row], formulation=formulation)
        other = by(second, b[row], first, a[row], p[row], formulation=formulation)
        assert one == other
        assert same_bits(one.dry_bulb, back.dry_bulb[row]) and same_bits(one.humidity_ratio, back.humidity_ratio[row])
        assert same_bits(one.speed_of_sound, back.speed_of_sound[row])


def test_other_pairs_are_refused_with_the_reason():
    refused = 0
    for first, second in itertools.combinations(SECOND, 2):
        if (first, second) in OFFERED or (second, first) in OFFERED:
            continue
        for value in (0.5, [0.5], []):
            with pytest.raises(moistair.UndeterminedError, match="make no state: ") as caught:
                by(first, value, second, value)
            assert caught.value.code == 209
        refused += 1
    assert refused == 16 * 15 // 2 - len(OFFERED)
    with pytest.raises(moistair.UndeterminedError, match="how much vapor"):
        by("dew_point", 10.0, "vapor_pressure", 1200.0)
    with pytest.raises(moistair.UndeterminedError, match="nearly along"):
        by("wet_bulb", 10.0, "specific_enthalpy", 30e3)
    with pytest.raises(moistair.UndeterminedError, match="every temperature"):
        by("humidity_ratio", 0.0, "relative_humidity", 0.0)


def test_what_no_state_has():
    with pytest.raises(moistair.UnattainableError, match="together with this ") as caught:
        by("dew_point", 20.0, "wet_bulb", 10.0)
    error = caught.value
    assert (error.code, error.quantity, error.value) == (210, "wet_bulb", 10.0)
    assert error.minimum == pytest.approx(20.0) and error.maximum > 30.0
    column = by("dew_point", [20.0, 20.0], "wet_bulb", [10.0, 25.0])
    assert column.status.tolist() == [210, 0] and column.failed == 1
