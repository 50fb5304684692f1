#![allow(clippy::float_cmp, reason = "what is compared here is exact")]

use super::*;
use proptest::prelude::*;
use std::vec::Vec;

const DAY: Channel = Channel::temperature(-40.0, 60.0);

/// Checks a row of readings, a minute apart.
fn reasons(channel: Channel, raw: impl IntoIterator<Item = f64>) -> Vec<Reason> {
    let mut state = ChannelState::default();
    let times = (0..).map(|minute| 60.0 * f64::from(minute));
    times.zip(raw).map(|(time, raw)| channel.check(&mut state, time, raw).reason()).collect()
}

fn only(channel: Channel, raw: f64) -> Checked {
    channel.check(&mut ChannelState::default(), 0.0, raw)
}

#[test]
fn codes_are_contiguous_and_come_back() {
    for (place, reason) in (0..).zip(Reason::ALL) {
        assert_eq!((reason.code(), Reason::from_code(place)), (place, Some(reason)));
    }
    assert_eq!(Reason::from_code(-1), None);
    assert!(Unit::ALL.into_iter().all(|unit| Unit::from_code(unit.code()) == Some(unit)));
    assert!(Kind::ALL.into_iter().all(|kind| Unit::ALL.into_iter().any(|unit| unit.measures(kind))));
    assert_eq!(std::format!("{:>8}", Quality::Good), "    good");
}

/// The customary units: NIST SP 811 (2008), appendix B, seven digits as printed there (from memory), so within half a
/// unit of the seventh. The others are powers of ten or definitions.
#[test]
fn units_convert() {
    const PRINTED: f64 = 5e-7;
    let cases = [
        (Unit::Kelvin, 273.15, 0.0, 0.0),
        (Unit::Fahrenheit, -40.0, -40.0, 0.0),
        (Unit::Percent, 103.0, 1.03, 0.0),
        (Unit::Kilopascal, 101.325, 101_325.0, 0.0),
        (Unit::Hectopascal, 1013.25, 101_325.0, 0.0),
        (Unit::Bar, 1.01325, 101_325.0, 0.0),
        (Unit::PoundPerSquareInch, 1.0, 6894.757, PRINTED),
        (Unit::InchOfMercury, 1.0, 3386.389, 0.0),
        (Unit::CubicMeterPerHour, 3600.0, 1.0, 0.0),
        (Unit::LiterPerSecond, 250.0, 0.25, 0.0),
        (Unit::CubicFootPerMinute, 1.0, 4.719474e-4, PRINTED),
        (Unit::KilogramPerHour, 1800.0, 0.5, 0.0),
        (Unit::PoundPerHour, 1.0, 1.259979e-4, PRINTED),
        (Unit::GramPerKilogram, 8.0, 0.008, 0.0),
        (Unit::Kilowatt, 1.5, 1500.0, 0.0),
        (Unit::Minute, 2.0, 120.0, 0.0),
        (Unit::Hour, 24.0, 86_400.0, 0.0),
        (Unit::KilowattHour, 2.5, 9e6, 0.0),
        (Unit::KilojoulePerKilogram, 50.3, 50_300.0, 0.0),
    ];
    for (unit, raw, expected, relative) in cases {
        let value = unit.to_core(raw);
        assert!((value - expected).abs() <= relative * expected.abs(), "{raw} {unit}: {value}");
    }
}

#[test]
fn units_convert_back() {
    for unit in Unit::ALL {
        for value in [0.0, 0.45, -17.7, 21.3, 101_325.0, 9e6] {
            // Zeros of the scales are some hundreds: a few of their units in the last place.
            let back = unit.to_core(unit.from_core(value));
            assert!((back - value).abs() <= 4.0 * f64::EPSILON * (value.abs() + 300.0), "{value} {unit}: {back}");
        }
        assert!(!unit.from_core(-0.0).is_sign_negative(), "{unit}");
    }
}

#[test]
fn a_reading_in_the_core_unit_comes_back_bit_for_bit() {
    for raw in [21.3, -0.1, f64::MIN_POSITIVE, 5e-324, 59.999999999999993] {
        assert_eq!(only(DAY, raw).value().map(f64::to_bits), Some(raw.to_bits()));
    }
    assert_eq!(only(DAY, -0.0).value().map(f64::to_bits), Some(0));
}

#[test]
fn limits_belong_to_the_range() {
    let up = f64::from_bits(60.0_f64.to_bits() + 1);
    let down = f64::from_bits((-40.0_f64).to_bits() + 1);
    assert_eq!([-40.0, 60.0].map(|t| only(DAY, t).reason()), [Reason::Ok; 2]);
    assert_eq!(only(DAY, down).reason(), Reason::BelowRange);
    assert_eq!(only(DAY.with_unit(Unit::Celsius), up).value(), None);
    assert_eq!(only(DAY, f64::INFINITY).reason(), Reason::AboveRange);
    assert_eq!(only(DAY, f64::NEG_INFINITY).reason(), Reason::BelowRange);
    assert_eq!(only(DAY, f64::NAN).reason(), Reason::Missing);
}

#[test]
fn saturation_is_clipped_up_to_the_tolerance() {
    let channel = Channel::relative_humidity_percent();
    for raw in [100.0 + 1e-12, 101.0, 103.0] {
        let wet = only(channel, raw);
        assert_eq!((wet.value(), wet.quality(), wet.reason()), (Some(1.0), Quality::Repaired, Reason::AboveSaturation));
    }
    assert_eq!(only(channel, 100.0).reason(), Reason::Ok);
    assert_eq!(only(channel, 103.0 + 1e-12).reason(), Reason::AboveRange);
    assert_eq!(only(channel, -0.1).reason(), Reason::BelowRange);
    // A command is no humidity.
    assert_eq!(only(Channel::command_percent(), 101.0).reason(), Reason::AboveRange);
}

#[test]
fn invalid_channels_refuse() {
    let broken = [
        DAY.with_range(60.0, -40.0),
        DAY.with_range(f64::NAN, 60.0),
        DAY.with_range(0.0, f64::INFINITY),
        DAY.with_unit(Unit::Pascal),
        DAY.with_hold(-1.0),
        DAY.with_interval(f64::NAN),
        DAY.with_stuck(-0.1, 5),
    ];
    for channel in broken {
        assert_eq!((channel.is_valid(), only(channel, 20.0).reason()), (false, Reason::ChannelInvalid));
    }
}

#[test]
fn slips_are_named_when_only_one_unit_fits() {
    let site = Channel::pressure(60_000.0, 110_000.0);
    let cases = [
        (DAY, 295.0, Reason::LooksLikeKelvin),
        (DAY, 72.0, Reason::LooksLikeFahrenheit),
        (DAY, 850.0, Reason::AboveRange),
        (DAY, -999.0, Reason::BelowRange),
        (DAY.with_unit(Unit::Kelvin), 21.0, Reason::LooksLikeOtherUnit),
        (Channel::temperature(5.0, 40.0).with_unit(Unit::Kelvin), 21.0, Reason::LooksLikeCelsius),
        (site, 1013.25, Reason::LooksLikeHectopascal),
        (site, 101.325, Reason::LooksLikeKilopascal),
        (site, 1.01325, Reason::LooksLikeBar),
        (site, 14.7, Reason::LooksLikePoundPerSquareInch),
        (site, 29.92, Reason::LooksLikeInchOfMercury),
        (site, 0.0, Reason::BelowRange),
        (site.with_unit(Unit::Kilopascal), 101_325.0, Reason::LooksLikePascal),
        (Channel::relative_humidity_fraction(), 45.0, Reason::LooksLikePercent),
        (Channel::relative_humidity_fraction(), 1.04, Reason::AboveRange),
        (Channel::relative_humidity_percent(), 104.0, Reason::AboveRange),
        (Channel::humidity_ratio(0.0, 0.04), 9.3, Reason::LooksLikeOtherUnit),
        (Channel::volume_flow(0.0, 5.0), 6.0, Reason::AboveRange),
        (Channel::volume_flow(0.0, 5.0), 3000.0, Reason::LooksLikeOtherUnit),
    ];
    for (channel, raw, reason) in cases {
        let checked = only(channel, raw);
        assert_eq!((checked.value(), checked.reason()), (None, reason), "{channel:?} {raw}");
    }
}

/// Relative humidity of a room as a fraction, wandering between 0.3 and 0.6.
fn room(minute: u32) -> f64 {
    0.3 + 0.01 * f64::from(minute * 7 % 31)
}

#[test]
fn fractions_on_a_percent_channel_are_found_out() {
    let channel = Channel::relative_humidity_percent();
    let found = reasons(channel, (0..100).map(room));
    let first = found.iter().position(|reason| *reason == Reason::LooksLikeFraction);
    assert_eq!(first, Some(60), "an hour of evidence");
    assert!(found.iter().skip(60).all(|reason| *reason == Reason::LooksLikeFraction));
    // Faster samples do not shorten the hour; a day of dry air between readings of 2 % is no slip.
    assert!(!reasons(channel, (0..59).map(room)).contains(&Reason::LooksLikeFraction));
    let dry = (0..1440).map(|minute| if minute % 50 == 0 { 2.0 } else { room(minute) });
    assert!(!reasons(channel, dry).contains(&Reason::LooksLikeFraction));
    // Off by request, and never for a closed valve.
    assert!(!reasons(channel.with_slip_samples(0), (0..1440).map(room)).contains(&Reason::LooksLikeFraction));
    assert!(!reasons(Channel::command_percent(), (0..1440).map(|_| 0.0)).contains(&Reason::LooksLikeFraction));
    assert!(!reasons(Channel::command_percent(), (0..1440).map(|_| 0.7)).contains(&Reason::LooksLikeFraction));
    // A dry room at a tenth of a percent does not reach what fractions would.
    assert!(!reasons(channel, (0..1440).map(|minute| 0.3 * room(minute))).contains(&Reason::LooksLikeFraction));
    // One true percent clears the suspicion.
    assert_eq!(reasons(channel, (0..100).map(room).chain([45.0])).last(), Some(&Reason::Ok));
}

#[test]
fn zero_is_no_evidence_of_fractions() {
    let channel = Channel::command_percent().with_slip_samples(4);
    let mut state = ChannelState::default();
    let mut at = |hour: u32, raw| channel.check(&mut state, 3600.0 * f64::from(hour), raw).reason();
    let found = [0.5, 0.0, 0.6, 0.6, 0.0, 0.0, 0.5, 0.0, 0.5];
    let first = found.into_iter().zip(0..).position(|(raw, hour)| at(hour, raw) == Reason::LooksLikeFraction);
    assert_eq!(first, Some(8), "the fourth that moved and is not zero");
}

#[test]
fn fractions_are_found_out_by_a_clock_set_back() {
    let channel = Channel::relative_humidity_percent();
    let mut state = ChannelState::default();
    for minute in 0..30 {
        assert!(channel.check(&mut state, 1e9 + 60.0 * f64::from(minute), room(minute)).value().is_some());
    }
    let found = (0..100).map(|minute| channel.check(&mut state, 60.0 * f64::from(minute), room(minute)).reason());
    assert_eq!(found.last(), Some(Reason::LooksLikeFraction));
}

#[test]
fn stuck_from_the_nth_sample_until_it_moves() {
    let channel = DAY.with_stuck(0.05, 4).with_hold(1e6);
    use Reason::{Held, Ok, Stuck};
    let raw = [20.0, 20.04, 19.96, 20.0, 20.04, f64::NAN, 20.0, 20.2, 20.2, f64::NAN];
    // While stuck nothing is held either: the last good value is the stuck one.
    assert_eq!(reasons(channel, raw), [Ok, Ok, Ok, Stuck, Stuck, Reason::Missing, Stuck, Ok, Ok, Held]);
    // A slow drift moves away from the first of the row.
    assert!(reasons(channel, (0..100).map(|i| 20.0 + 0.02 * f64::from(i))).iter().all(|reason| *reason == Ok));
    assert_eq!(reasons(DAY, [20.0; 1000]), [Ok; 1000]);
    assert_eq!(reasons(DAY.with_stuck(0.05, 1), [20.0; 10]), [Ok; 10]);
    // Above saturation the reading lives on, though the value does not.
    let wet = Channel::relative_humidity_percent().with_stuck(0.0005, 2);
    assert_eq!(
        reasons(wet, [101.0, 101.2, 100.9, 100.9])[1..],
        [Reason::AboveSaturation, Reason::AboveSaturation, Stuck]
    );
}

#[test]
fn a_plant_at_rest_is_not_stuck() {
    let channel = DAY.with_stuck(0.05, 4).with_reference_resolution(0.5);
    let mut state = ChannelState::default();
    let mut check =
        |minute: u32, reference| channel.check_beside(&mut state, 60.0 * f64::from(minute), 20.0, reference).reason();
    assert!((0..100).all(|minute| check(minute, 5.0 + 0.4 * f64::from(minute % 2)) == Reason::Ok));
    assert!((100..110).all(|minute| check(minute, f64::NAN) == Reason::Ok));
    let moving = [110, 111, 112, 113].map(|minute| check(minute, f64::from(minute)));
    assert_eq!(moving, [Reason::Ok, Reason::Ok, Reason::Stuck, Reason::Stuck]);

    let mut state = ChannelState::default();
    let references = [f64::NAN, f64::INFINITY, f64::NAN, 1.0, 2.0, 3.0, f64::INFINITY, 3.1, 4.0];
    let found = references.into_iter().zip(0..).position(|(reference, minute)| {
        channel.check_beside(&mut state, 60.0 * f64::from(minute), 20.0, reference).value().is_none()
    });
    assert_eq!(found, Some(8), "the third move of the reference");
}

#[test]
fn the_last_good_value_is_held_up_to_its_age() {
    let channel = DAY.with_hold(120.0).with_interval(60.0);
    let mut state = ChannelState::default();
    assert_eq!(channel.check(&mut state, 0.0, f64::NAN).reason(), Reason::Missing);
    assert_eq!(channel.check(&mut state, 60.0, 20.0).reason(), Reason::Ok);
    for (time, raw, cause) in [(120.0, f64::NAN, Reason::Missing), (180.0, 295.0, Reason::LooksLikeKelvin)] {
        let held = channel.check(&mut state, time, raw);
        assert_eq!((held.value(), held.quality()), (Some(20.0), Quality::Repaired));
        assert_eq!((held.reason(), held.cause()), (Reason::Held, cause));
    }
    let old = channel.check(&mut state, 180.000001, f64::NAN);
    assert_eq!((old.value(), old.value_or(-1.0), old.reason()), (None, -1.0, Reason::Missing));
    assert_eq!(state.last_good(), Some((20.0, 60.0)));
    // A value that narrower limits exclude is not held.
    let narrow = channel.with_range(21.0, 30.0).with_hold(1e6);
    assert_eq!(narrow.check(&mut state, 200.0, f64::NAN).reason(), Reason::Missing);
    assert_eq!(channel.with_hold(1e6).check(&mut state, 210.0, f64::NAN).reason(), Reason::Held);
}

#[test]
fn a_gap_is_marked_whatever_the_quality() {
    let channel = Channel::relative_humidity_percent().with_interval(60.0);
    let mut state = ChannelState::default();
    let mut at = |time, raw| {
        let checked = channel.check(&mut state, time, raw);
        (checked.reason(), checked.quality(), checked.after_gap())
    };
    assert_eq!(at(0.0, 50.0), (Reason::Ok, Quality::Good, false));
    assert_eq!(at(90.0, 50.0), (Reason::Ok, Quality::Good, false));
    assert_eq!(at(180.1, 50.0), (Reason::Gap, Quality::Good, true));
    assert_eq!(at(1e6, 101.0), (Reason::AboveSaturation, Quality::Repaired, true));
    assert_eq!(at(2e6, f64::NAN), (Reason::Missing, Quality::Refused, true));
}

#[test]
fn time_must_increase() {
    let mut state = ChannelState::default();
    let mut at = |time| DAY.check(&mut state, time, 20.0).reason();
    assert_eq!(at(f64::NAN), Reason::TimeInvalid);
    assert_eq!(at(1_700_000_000_000.0), Reason::TimeInvalid, "milliseconds");
    assert_eq!(at(f64::INFINITY), Reason::TimeInvalid);
    assert_eq!([at(100.0), at(100.0), at(40.0), at(100.0)], {
        use Reason::*;
        [Ok, TimeNotIncreasing, TimeNotIncreasing, TimeNotIncreasing]
    });
    assert_eq!([at(160.0), at(159.0), at(220.0)], [Reason::Ok, Reason::TimeNotIncreasing, Reason::Ok]);
}

#[test]
fn a_clock_set_back_is_believed_after_three_samples() {
    let channel = DAY.with_hold(1e9);
    let mut state = ChannelState::default();
    let mut at = |time, raw| channel.check(&mut state, time, raw).reason();
    use Reason::{Gap, Held, Missing, Ok, TimeNotIncreasing};
    assert_eq!([at(0.0, 20.0), at(1e10, 20.0)], [Ok, Ok]);
    // What was good by the wrong clock has no age any more.
    assert_eq!(
        [at(60.0, 20.0), at(120.0, 20.0), at(180.0, f64::NAN), at(240.0, 20.0)],
        [TimeNotIncreasing, TimeNotIncreasing, Missing, Ok]
    );
    assert_eq!(at(300.0, f64::NAN), Held);
    assert_eq!([at(10.0, 20.0), at(20.0, 20.0), at(30.0, 20.0)], [TimeNotIncreasing, TimeNotIncreasing, Gap]);
}

#[test]
fn parts_from_c_are_checked() {
    let good = only(DAY, 20.0);
    let again = Checked::from_codes(20.0, good.quality().code(), good.reason().code(), good.cause().code(), false);
    assert_eq!(again.and_then(|checked| checked.value()), Some(20.0));
    assert!(Checked::from_codes(20.0, 3, 0, 0, false).is_none());
    assert!(Checked::from_codes(20.0, 0, 99, 0, false).is_none());
    assert!(Checked::from_codes(f64::NAN, 0, 0, 0, false).is_none());
    assert!(Checked::from_codes(f64::NAN, 2, 1, 1, false).is_some());
}

/// No padding at all: every byte of a structure that C holds is a number.
#[test]
fn layout_is_that_of_c() {
    assert_eq!(size_of::<Channel>(), 6 * 8 + 4 * 4);
    assert_eq!(size_of::<Clock>(), 2 * 8 + 2 * 4);
    assert_eq!(size_of::<ChannelState>(), size_of::<Clock>() + 7 * 8 + 4 * 4);
    assert_eq!(size_of::<Checked>(), 8 + 4 * 4);
}

/// Random bits, with numbers that a plant could send mixed in.
fn any_bits() -> impl Strategy<Value = f64> {
    prop_oneof![
        any::<u64>().prop_map(f64::from_bits),
        -50.0..150.0_f64,
        Just(f64::NAN),
        Just(f64::INFINITY),
        Just(-0.0),
        Just(5e-324),
    ]
}

fn any_channel() -> impl Strategy<Value = Channel> {
    let codes = (0..Kind::ALL.len(), 0..Unit::ALL.len());
    (codes, [any_bits(), any_bits(), any_bits(), any_bits(), any_bits()], 0..9_u32, any::<bool>()).prop_map(
        |((kind, unit), [min, max, resolution, hold, interval], samples, sane)| {
            let channel = Channel::new(Kind::ALL[kind], Unit::ALL[unit], min, max);
            let channel = if sane { DAY } else { channel };
            channel.with_stuck(resolution.abs(), samples).with_hold(hold.abs()).with_interval(interval.abs())
        },
    )
}

proptest! {
    /// Whatever came before, a value that is not refused is finite and in range, and after bad samples a sound signal
    /// is good again as soon as the clock is believed.
    #[test]
    fn nothing_spoils_a_later_sample(
        channel in any_channel(),
        samples in proptest::collection::vec((any_bits(), any_bits(), any_bits()), 0..40),
        start in -1e10..1e10_f64,
    ) {
        let mut state = ChannelState::default();
        for (time, raw, reference) in samples {
            let checked = channel.check_beside(&mut state, time, raw, reference);
            if let Some(value) = checked.value() {
                prop_assert!(value.is_finite() && channel.min() <= value && value <= channel.max());
            }
            prop_assert_eq!(checked.value().is_none(), checked.quality() == Quality::Refused);
            prop_assert_eq!(checked.cause() == checked.reason(), checked.reason() != Reason::Held);
        }
        let sound = DAY.with_stuck(0.01, 2);
        let mut last = Reason::Missing;
        for step in 0..=RESTART_SAMPLES {
            last = sound.check(&mut state, start + f64::from(step), 20.0 + f64::from(step)).reason();
        }
        prop_assert_eq!(last, Reason::Ok);
    }

    #[test]
    fn any_bits_are_a_clock(bits in any::<[i64; 2]>(), counts in any::<[u32; 2]>(), start in -1e10..1e10_f64) {
        let mut clock = Clock::from_parts(bits, counts);
        let ticks = [0.0, 1.0, 2.0, 3.0].map(|step| clock.step(start + step));
        prop_assert_eq!(ticks[3], Tick::Forward { microseconds: 1_000_000 });
    }

    /// Differences of long time stamps are exact in microseconds.
    #[test]
    fn time_is_exact_to_the_microsecond(start in 0..2_000_000_000_000_000_i64, step in 1..86_400_000_000_i64) {
        let mut clock = Clock::default();
        clock.step(start as f64 / 1e6);
        prop_assert_eq!(clock.step((start + step) as f64 / 1e6), Tick::Forward { microseconds: step });
    }
}
