#![allow(clippy::float_cmp, reason = "what is compared here is exact")]

use super::*;
use crate::signal::{Channel, ChannelState, Quality, Reason};
use proptest::prelude::*;
use std::vec::Vec;

fn ulp(x: f64) -> f64 {
    f64::from_bits(x.abs().to_bits() + 1) - x.abs()
}

/// A meter that adds the same increment every 100 ms for 25 days, and a clock beside it.
#[test]
fn equal_increments_do_not_drift() {
    const SAMPLES: u32 = 22_000_000;
    let increment = 1234.5678_f64 * 0.1;
    let (mut sum, mut naive, mut single) = (Sum::default(), 0.0_f64, 0.0_f32);
    for _ in 0..SAMPLES {
        sum.add(increment);
        naive += increment;
        single += 0.1;
    }
    // One product, rounded once.
    let exact = increment * f64::from(SAMPLES);
    assert!((sum.value() - exact).abs() <= ulp(exact), "{:e}", sum.value() - exact);
    assert!((naive - exact).abs() > 1e4 * ulp(exact), "{:e}", naive - exact);
    // Single precision stands still once 0.1 is less than half a unit in the last place.
    assert_eq!(single, 2_097_152.0);
}

#[test]
fn a_total_of_equal_steps_is_exact_to_one_unit_in_the_last_place() {
    const SAMPLES: u32 = 2_000_000;
    for rule in Rule::ALL {
        let mut total = Total::new(rule, 1.0);
        for sample in 0..=SAMPLES {
            total.add(1.7e9 + f64::from(sample) * 0.1, 1234.5678, Quality::Good);
        }
        let exact = 1234.5678 * (f64::from(SAMPLES) / 10.0);
        assert!((total.total() - exact).abs() <= ulp(exact), "{rule}: {:e}", total.total() - exact);
        assert_eq!((total.covered_seconds(), total.coverage()), (200_000.0, 1.0));
    }
}

#[test]
fn rules_differ_as_they_should() {
    let total = |rule| {
        let mut total = Total::new(rule, 100.0);
        for (time, rate) in [(0.0, 4.0), (10.0, -2.0), (30.0, 6.0)] {
            total.add(time, rate, Quality::Good);
        }
        [total.positive(), total.negative(), total.total(), total.lowest().unwrap(), total.highest().unwrap()]
    };
    let mut falling = Total::new(Rule::Trapezoid, 10.0);
    falling.add(0.0, -0.0, Quality::Good);
    falling.add(10.0, -3.0, Quality::Good);
    assert_eq!((falling.lowest(), falling.highest().map(f64::to_bits)), (Some(-3.0), Some(0)));
    assert_eq!(total(Rule::Step), [40.0, -40.0, 0.0, -2.0, 4.0]);
    // Zero is crossed after 2/3 of the first and 1/4 of the second span.
    let expected = [0.5 * 4.0 * 20.0 / 3.0 + 0.5 * 6.0 * 15.0, -0.5 * 2.0 * (10.0 / 3.0 + 5.0), 50.0, -2.0, 6.0];
    for (value, expected) in total(Rule::Trapezoid).into_iter().zip(expected) {
        assert!((value - expected).abs() < 1e-13, "{value} {expected}");
    }
}

#[test]
fn refused_samples_leave_holes() {
    let run = |rule| {
        let mut total = Total::new(rule, 60.0);
        let samples = [
            (0.0, 1.0, Quality::Good),
            (60.0, 9.0, Quality::Refused),
            (120.0, f64::NAN, Quality::Good),
            (180.0, 3.0, Quality::Repaired),
            (240.0, 3.0, Quality::Good),
        ];
        let added: Vec<_> = samples.into_iter().map(|(time, rate, quality)| total.add(time, rate, quality)).collect();
        (added, total.total(), total.covered_seconds(), total.repaired_seconds(), total.elapsed_seconds())
    };
    use Added::{Counted, Hole, Started};
    assert_eq!(run(Rule::Step), ([Started, Counted, Hole, Hole, Counted].to_vec(), 240.0, 120.0, 60.0, 240.0));
    assert_eq!(run(Rule::Trapezoid), ([Started, Hole, Hole, Hole, Counted].to_vec(), 180.0, 60.0, 60.0, 240.0));
}

#[test]
fn time_and_overflow_do_no_harm() {
    let mut total = Total::new(Rule::Step, f64::INFINITY);
    assert_eq!((total.mean(), total.lowest(), total.coverage()), (None, None, 0.0));
    assert_eq!(total.add(f64::NAN, 1.0, Quality::Good), Added::TimeRefused);
    assert_eq!(total.add(0.0, f64::MAX, Quality::Good), Added::Started);
    assert_eq!(total.add(10.0, 1.0, Quality::Good), Added::Overflow);
    assert_eq!(total.add(10.0, 5.0, Quality::Good), Added::TimeRefused);
    assert_eq!(total.add(20.0, 1.0, Quality::Good), Added::Counted);
    assert_eq!((total.total(), total.coverage(), total.highest()), (10.0, 0.5, Some(1.0)));
    // Set back to zero: the third sample is believed, and the span to it is not counted.
    let back = [0.0, 1.0, 2.0, 3.0].map(|time| total.add(time, 7.0, Quality::Good));
    assert_eq!(back, [Added::TimeRefused, Added::TimeRefused, Added::Gap, Added::Counted]);
    assert_eq!(total.total(), 17.0);
}

#[test]
fn what_cancels_leaves_the_small_remainder() {
    let mut total = Total::new(Rule::Step, 1.0);
    for (time, rate) in [(0.0, 1e16), (1.0, 1.0), (2.0, -1e16), (3.0, 0.0)] {
        total.add(time, rate, Quality::Good);
    }
    assert_eq!(total.total(), 1.0);
}

#[test]
fn totals_never_started_bridge_nothing() {
    let mut total = Total::default();
    total.add(0.0, 1.0, Quality::Good);
    assert_eq!(total.add(1.0, 1.0, Quality::Good), Added::Gap);
}

#[test]
fn counts_by_quality_and_reason() {
    let channel = Channel::relative_humidity_percent().with_interval(60.0).with_hold(60.0);
    let (mut state, mut counts) = (ChannelState::default(), Counts::default());
    for (time, raw) in [(0.0, 50.0), (60.0, 101.0), (120.0, f64::NAN), (180.0, f64::NAN), (600.0, 50.0), (500.0, 50.0)]
    {
        counts.record(&channel.check(&mut state, time, raw));
    }
    let mut both = counts;
    both.merge(&counts);
    for (counts, n) in [(counts, 1), (both, 2)] {
        assert_eq!(Quality::ALL.map(|quality| counts.quality(quality)), [2 * n, 2 * n, 2 * n]);
        let found = Reason::ALL.into_iter().filter(|reason| counts.reason(*reason) == n).count();
        assert_eq!((found, counts.samples(), counts.gaps()), (6, 6 * n, n));
        assert_eq!(counts.held_because(Reason::Missing), n);
        assert_eq!(counts.share(Quality::Good), 1.0 / 3.0);
    }
    assert_eq!(Counts::default().share(Quality::Good), 0.0);
}

#[test]
fn every_code_has_a_place() {
    assert!(Reason::ALL.into_iter().all(|reason| (0..REASON_SLOTS as i32).contains(&reason.code())));
    assert!(Quality::ALL.into_iter().all(|quality| (0..QUALITY_SLOTS as i32).contains(&quality.code())));
}

#[test]
fn books_keep_the_worst_and_the_sum() {
    let mut heat = Residuals::default();
    assert_eq!((heat.add(-3.0, 100.0), heat.add(1.0, 20.0), heat.add(0.0, 0.0)), (true, true, true));
    for (residual, scale) in [(f64::NAN, 1.0), (1.0, f64::INFINITY), (1.0, 0.0), (1.0, -2.0), (0.0, f64::NAN)] {
        assert!(!heat.add(residual, scale), "{residual} {scale}");
    }
    let mut both = heat;
    assert!(both.merge(&heat));
    assert_eq!((heat.sum_of_residuals(), heat.sum_of_scales(), heat.samples(), heat.refused()), (4.0, 120.0, 3, 5));
    assert_eq!((both.largest_relative(), both.relative(), both.samples()), (0.05, 4.0 / 120.0, 6));
    let mut books = BooksTotal::default();
    assert!(books.add(-3.0, 100.0, 1e-6, 1.0) && !books.add(f64::NAN, 1.0, 1e-6, 1.0));
    let other = books;
    assert!(books.merge(&other));
    assert_eq!((books.heat().samples(), books.heat().refused(), books.water().samples()), (2, 2, 4));
}

#[test]
fn deviations_merge() {
    let mut whole = Deviation::default();
    assert_eq!((whole.mean(), whole.root_mean_square(), whole.lowest(), whole.highest()), (None, None, None, None));
    let mut halves = [whole; 2];
    for (i, (measured, computed)) in
        [(1.0, 2.0), (5.0, 2.0), (-2.0, -2.0), (f64::MAX, -1.0), (0.5, f64::INFINITY)].into_iter().enumerate()
    {
        whole.add(measured, computed);
        halves[i % 2].add(measured, computed);
    }
    let [mut merged, other] = halves;
    assert!(merged.merge(&other) && merged.merge(&Deviation::default()));
    assert_eq!(merged, whole);
    assert_eq!((whole.samples(), whole.refused(), whole.lowest(), whole.highest()), (3, 2, Some(-1.0), Some(3.0)));
    assert_eq!((whole.mean(), whole.root_mean_square()), (Some(2.0 / 3.0), Some((10.0_f64 / 3.0).sqrt())));
    assert!(!Deviation::default().add(1e200, 0.0));
}

#[test]
fn an_unfinished_period_is_padded() {
    let mut hours = Periods::new(3600.0, Total::new(Rule::Step, 60.0));
    assert_eq!(hours.unfinished(), None);
    hours.add(7200.0 + 3540.0, 1.0, Quality::Good);
    hours.add(7200.0 + 3599.0, 1.0, Quality::Good);
    let last = hours.unfinished().unwrap();
    assert_eq!((last.start, last.total.covered_seconds(), last.total.elapsed_seconds()), (7200.0, 59.0, 3600.0));
    assert_eq!(hours.current().elapsed_seconds(), 3599.0);
}

#[test]
fn no_padding() {
    assert_eq!(size_of::<Total>(), 2 * 16 + 4 * 8 + 3 * 8 + 24 + 8);
    assert_eq!(size_of::<Periods>(), size_of::<Total>() + 16);
    assert_eq!(size_of::<Residuals>(), 32 + 24);
    assert_eq!(size_of::<BooksTotal>(), 2 * size_of::<Residuals>() + 8);
    assert_eq!(size_of::<Deviation>(), 2 * 16 + 2 * 8 + 2 * 8);
    assert_eq!(size_of::<Counts>(), 8 * (QUALITY_SLOTS + 2 * REASON_SLOTS + 1));
}

#[test]
fn a_pause_does_not_run_through_its_periods() {
    let mut hours = Periods::new(3600.0, Total::new(Rule::Trapezoid, f64::INFINITY));
    assert_eq!(hours.add(-1e10, 1.0, Quality::Good), None);
    let first = hours.add(1e10, 1.0, Quality::Good).unwrap();
    assert!((first.start - -1e10).abs() < 3600.0 && first.total.covered_seconds() == 0.0);
    assert_eq!(first.total.elapsed_seconds(), 3600.0);
    assert!(hours.start() <= 1e10 && 1e10 < hours.start() + 3600.0);
    // A clock set back begins the period that it points into.
    assert_eq!([0.0, 60.0].map(|time| hours.add(time, 1.0, Quality::Good)), [None, None]);
    assert!(hours.add(120.0, 1.0, Quality::Good).is_some());
    assert_eq!((hours.start(), hours.current().elapsed_seconds()), (0.0, 120.0));
    // Nonsense lengths are bounded.
    for length in [f64::NAN, -1.0, 0.0, f64::INFINITY] {
        let mut periods = Periods::new(length, Total::new(Rule::Step, 10.0));
        assert!(
            [0.0, 1.0, 2.0]
                .into_iter()
                .all(|time| periods.add(time, 1.0, Quality::Good).is_none_or(|p| p.start <= 2.0))
        );
    }
}

#[test]
fn a_sample_on_the_boundary_begins_the_next_period() {
    let mut hours = Periods::new(3600.0, Total::new(Rule::Step, 3600.0));
    assert_eq!(hours.add(0.0, 2.0, Quality::Good), None);
    let hour = hours.add(3600.0, 5.0, Quality::Good).unwrap();
    assert_eq!((hour.start, hour.total.total(), hour.total.coverage()), (0.0, 7200.0, 1.0));
    let hour = hours.add(7200.0, 0.0, Quality::Good).unwrap();
    assert_eq!((hour.start, hour.total.mean(), hour.total.lowest()), (3600.0, Some(5.0), Some(5.0)));
}

fn rule() -> impl Strategy<Value = Rule> {
    prop_oneof![Just(Rule::Step), Just(Rule::Trapezoid)]
}

fn quality() -> impl Strategy<Value = Quality> {
    prop_oneof![8 => Just(Quality::Good), 1 => Just(Quality::Repaired), 1 => Just(Quality::Refused)]
}

proptest! {
    /// Any order of any terms: as good as one rounding of the exact sum, which integers give.
    #[test]
    fn sums_of_integers_are_exact(terms in proptest::collection::vec(-(1_i64 << 52)..(1_i64 << 52), 0..300)) {
        let (mut sum, mut halves) = (Sum::default(), [Sum::default(); 2]);
        for (i, term) in terms.iter().enumerate() {
            sum.add(*term as f64);
            halves[i % 2].add(*term as f64);
        }
        let [mut merged, other] = halves;
        merged.merge(&other);
        let exact = terms.iter().map(|term| i128::from(*term)).sum::<i128>() as f64;
        prop_assert_eq!([sum.value(), merged.value()], [exact; 2]);
    }

    /// Hours merged into a day are the day, to the microsecond and to rounding, and each hour covers no more than itself.
    #[test]
    fn periods_add_up(
        rule in rule(),
        steps in proptest::collection::vec((1..2_000_000_000_i64, -100.0..100.0_f64, quality()), 1..200),
        longest in 100.0..3600.0_f64,
    ) {
        let empty = Total::new(rule, longest);
        let (mut whole, mut hours, mut day) = (empty, Periods::new(3600.0, empty), empty);
        let (mut time, mut size) = (0, 0.0);
        // From the start of an hour, where both begin to count.
        for (step, rate, quality) in [(0, 1.0, Quality::Good)].into_iter().chain(steps) {
            time += step;
            size += rate.abs() * step as f64 / 1e6 + 100.0 * step as f64 / 1e6;
            whole.add(time as f64 / 1e6, rate, quality);
            if let Some(hour) = hours.add(time as f64 / 1e6, rate, quality) {
                prop_assert_eq!(hour.total.elapsed_seconds(), 3600.0);
                prop_assert!(hour.total.coverage() <= 1.0);
                day.merge(&hour.total);
            }
        }
        day.merge(hours.current());
        prop_assert_eq!(day.elapsed_seconds(), whole.elapsed_seconds());
        prop_assert_eq!(day.covered_seconds(), whole.covered_seconds());
        prop_assert_eq!(day.repaired_seconds(), whole.repaired_seconds());
        for (a, b) in [(day.total(), whole.total()), (day.positive(), whole.positive()), (day.negative(), whole.negative())] {
            prop_assert!((a - b).abs() <= 4.0 * f64::EPSILON * size, "{} {}", a, b);
        }
        prop_assert_eq!((day.lowest(), day.highest()), (whole.lowest(), whole.highest()));
    }

    /// No sample makes a total that is not finite.
    #[test]
    fn totals_stay_finite(
        rule in rule(),
        samples in proptest::collection::vec((any::<u64>(), any::<u64>(), -1e12..1e12_f64, any::<bool>()), 0..50),
    ) {
        let mut total = Total::new(rule, f64::INFINITY);
        let mut minutes = Periods::new(60.0, total);
        for (time, rate, seconds, wild) in samples {
            let time = if wild { f64::from_bits(time) } else { seconds };
            total.add(time, f64::from_bits(rate), Quality::Good);
            minutes.add(time, f64::from_bits(rate), Quality::Good);
        }
        let sums = [total.positive(), total.negative(), minutes.current().positive(), minutes.current().negative()];
        prop_assert!(sums.into_iter().all(f64::is_finite), "{:?}", total);
        prop_assert!((0.0..=1.0).contains(&total.coverage()));
        prop_assert!(total.positive() >= 0.0 && total.negative() <= 0.0);
    }
}
