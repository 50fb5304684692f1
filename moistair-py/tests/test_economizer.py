"""Economizer: one decision at a time and columns, safe whatever is wrong, settings and state as objects."""

import copy
import dataclasses
import math
import pickle
import re

import moistair
import numpy as np
import pytest
from moistair.process import economizer, mixing
from moistair.process.economizer import Decision, Economizer, EconomizerReason, EconomizerRule, EconomizerState, MarginQuantity
from moistair.process.measured import MeasuredAir, Reading, within
from moistair.signal import Quality
from support import random

SEA_LEVEL = 101_325.0
NAN = float("nan")


def air(t, rh, quality=0):
    return MeasuredAir(
        dry_bulb=Reading(t, standard_uncertainty=0.3, quality=quality),
        relative_humidity=Reading(rh, standard_uncertainty=0.02),
    )


def settings(rule=EconomizerRule.DIFFERENTIAL_ENTHALPY, **more):
    return Economizer(rule=rule, pressure=SEA_LEVEL, **more)


def test_enumerations_are_those_of_the_core():
    table = moistair._core.economizer_codes()
    assert len(table) == 8 + 15 + 5 + 3
    for kind, name, code, _ in table:
        enumeration = getattr(economizer, kind, None) or getattr(mixing, kind)
        assert enumeration(code).name == re.sub(r"(?<=[a-z])(?=[A-Z])", "_", name).upper()
    for member in MarginQuantity:
        assert moistair.QUANTITIES[member.name.lower()].code == member


def test_a_column_is_one_decision_after_the_other():
    generator = random(3)
    times = np.cumsum(generator.uniform(1.0, 400.0, 300))
    t = 21.0 + 6.0 * np.sin(times / 9e3) + generator.normal(0.0, 0.5, 300)
    rh = generator.uniform(0.3, 0.7, 300)
    t[40:45], rh[100:110] = NAN, 1.3
    quality = np.zeros(300)
    quality[150:155] = Quality.REFUSED
    compared = 0
    for rule in EconomizerRule:
        column, single = EconomizerState(), EconomizerState()
        chosen = settings(rule, fallback="dry_bulb" if rule % 2 else "least_outdoor_air")
        many = chosen.decide(column, time=times, outdoor=air(t, rh, quality), returned=air(24.0, 0.5))
        for row in range(300):
            outdoor = air(float(t[row]), float(rh[row]), int(quality[row]))
            one = chosen.decide(single, time=float(times[row]), outdoor=outdoor, returned=air(24.0, 0.5))
            for field in dataclasses.fields(Decision):
                assert getattr(one, field.name) == getattr(many, field.name)[row], (rule, row, field.name)
                compared += 1
        assert column == single and column.switches == np.count_nonzero(np.diff(many.enabled.astype(int), prepend=0))
        assert not many.enabled[40:45].any() and not many.enabled[150:155].any()
        assert np.isfinite(many.margin).all() and many.reason.dtype == np.int32
    print(f"economizer: {compared} fields compared")


def test_every_bad_reading_is_safe():
    for rule in EconomizerRule:
        for value in (NAN, math.inf, -999.0, 850.0):
            decision = settings(rule).decide(EconomizerState(), time=0.0, outdoor=air(value, 0.5), returned=air(24.0, 0.5))
            assert (decision.enabled, decision.reason) == (False, EconomizerReason.OUTDOOR_DRY_BULB_BAD)
            assert (decision.margin, decision.confidence, decision.quality) == (0.0, 0.0, Quality.REFUSED)
    without = settings().decide(EconomizerState(), time=0.0, outdoor=air(15.0, 0.5))
    assert without.reason is EconomizerReason.RETURN_DRY_BULB_BAD
    dry = settings(fallback="dry_bulb").decide(EconomizerState(), time=0.0, outdoor=air(15.0, NAN), returned=air(24.0, 0.5))
    assert dry.enabled is True and dry.fallback is True and dry.margin_quantity is MarginQuantity.DRY_BULB
    late = settings().decide(EconomizerState(), time=NAN, outdoor=air(15.0, 0.5), returned=air(24.0, 0.5))
    assert late.reason is EconomizerReason.CLOCK_INVALID


def test_settings():
    assert settings().check() is None
    wrong = settings(temperature_hysteresis=-1.0)
    with pytest.raises(moistair.OutOfRangeError, match="temperature hysteresis"):
        wrong.check()
    decision = wrong.decide(EconomizerState(), time=0.0, outdoor=air(15.0, 0.5), returned=air(24.0, 0.5))
    assert decision.reason is EconomizerReason.SETTINGS_INVALID
    assert math.isclose(settings().enthalpy_limit, 47_244.0, abs_tol=10.0)
    with pytest.raises(ValueError, match="fallback"):
        settings(fallback="guess").check()
    with pytest.raises(dataclasses.FrozenInstanceError):
        wrong.rule = EconomizerRule.FIXED_DRY_BULB
    assert pickle.loads(pickle.dumps(wrong)) == wrong


def test_states_are_copied_and_pickled():
    state = EconomizerState()
    settings().decide(state, time=0.0, outdoor=air(15.0, 0.5), returned=air(24.0, 0.5))
    assert state.is_on and state.switches == 1 and not state.is_frozen
    for twin in (copy.copy(state), copy.deepcopy(state), pickle.loads(pickle.dumps(state))):
        assert twin == state
    measured = pickle.loads(pickle.dumps(air(15.0, 0.5)))
    assert repr(measured) == repr(air(15.0, 0.5))


def test_what_is_no_reading():
    with pytest.raises(TypeError, match="dry_bulb must be Reading"):
        MeasuredAir(dry_bulb=20.0)
    with pytest.raises(TypeError, match="one humidity"):
        MeasuredAir(dry_bulb=within(20.0, 0.5), relative_humidity=within(0.5, 0.1), dew_point=within(5.0, 0.1))
    with pytest.raises(TypeError, match="no quantity"):
        MeasuredAir(dry_bulb=within(20.0, 0.5), wetness=within(0.5, 0.1))
    with pytest.raises(AttributeError):
        within(20.0, 0.5).value = 3.0
    with pytest.raises(ValueError, match="one dimension"):
        settings().decide(EconomizerState(), time=np.zeros((2, 2)), outdoor=air(15.0, 0.5), returned=air(24.0, 0.5))
    with pytest.raises(ValueError, match="tracer"):
        reading = within(1.0, 0.1)
        mixing.outdoor_air_from_readings(quantity="dew_point", outdoor=reading, returned=reading, mixed=reading)
    same = within(24.0, 0.1)
    found = mixing.outdoor_air_from_readings(quantity="dry_bulb", outdoor=same, returned=same, mixed=same)
    assert math.isnan(found.fraction) and found.fraction_status is mixing.FractionStatus.INDETERMINATE
