//! Totals over time, owned by the caller.

use core::mem::transmute;

use moistair_core::account::{
    BooksTotal, Counts, Deviation, Period, Periods, QUALITY_SLOTS, REASON_SLOTS, Residuals, Rule, Total,
};
use moistair_core::columns::NAN;
use moistair_core::process::books::Books;
use moistair_core::signal::Quality;
use moistair_core::{HeatFlow, MassFlow};

use crate::memory::{Answer, answer, check, check_optional, read, report, write};
use crate::process::moistair_books;
use crate::signal::{moistair_checked, quality};
use crate::status::{Failure, moistair_error};

/// It holds until the next sample: records on change of value, commands, counters.
pub const MOISTAIR_RULE_STEP: i32 = 0;
/// It runs straight to the next sample: densely sampled, smooth signals.
pub const MOISTAIR_RULE_TRAPEZOID: i32 = 1;

/// The first sample: there is no time before it.
pub const MOISTAIR_ADDED_STARTED: i32 = 0;
/// Counted.
pub const MOISTAIR_ADDED_COUNTED: i32 = 1;
/// Not counted: the rate that would have to cover it was refused.
pub const MOISTAIR_ADDED_HOLE: i32 = 2;
/// Not counted: longer than the longest step, or the clock was set back.
pub const MOISTAIR_ADDED_GAP: i32 = 3;
/// The sample's time is not usable; the sample is ignored.
pub const MOISTAIR_ADDED_TIME_REFUSED: i32 = 4;
/// Not counted: the total would not be finite.
pub const MOISTAIR_ADDED_OVERFLOW: i32 = 5;

/// Places for counts by quality; the code of a quality is its place.
pub const MOISTAIR_QUALITY_SLOTS: usize = 4;
/// Places for counts by reason; the code of a reason is its place.
pub const MOISTAIR_REASON_SLOTS: usize = 32;

/// Counts of checked samples by quality and by reason. Zeroed at first.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_counts {
    /// Samples of each quality.
    pub by_quality: [u64; MOISTAIR_QUALITY_SLOTS],
    /// Samples with each reason.
    pub by_reason: [u64; MOISTAIR_REASON_SLOTS],
    /// Samples that were filled with the last good value, by what was wrong with the reading.
    pub held_by_cause: [u64; MOISTAIR_REASON_SLOTS],
    /// Gaps.
    pub after_gap: u64,
}

/// The total over time of a rate. Made by moistair_total_new; may be copied and stored, not looked into.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_total {
    /// Made by moistair_total_new.
    pub words: [u64; 15],
}

/// What a total has come to. The unit is that of the rate times s; means and extremes have the unit of the rate.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_total_values {
    /// The total.
    pub total: f64,
    /// The part with a positive rate.
    pub positive: f64,
    /// The part with a negative rate, not above 0.
    pub negative: f64,
    /// Mean rate over the covered time; NaN while nothing is covered.
    pub mean: f64,
    /// Lowest rate in the covered time; NaN while nothing is covered.
    pub lowest: f64,
    /// Highest rate in the covered time; NaN while nothing is covered.
    pub highest: f64,
    /// The time that the total stands for [s].
    pub covered_seconds: f64,
    /// The part of it that rests on repaired samples [s].
    pub repaired_seconds: f64,
    /// The time from the first to the last sample, gaps included [s].
    pub elapsed_seconds: f64,
    /// Covered over elapsed time, 0 to 1; 0 while no time has passed.
    pub coverage: f64,
}

/// A finished period.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_period {
    /// When it began [s].
    pub start: f64,
    /// Its total.
    pub total: moistair_total,
}

/// A total that is cut at the multiples of a period. Made by moistair_periods_new; may be copied and stored, not looked into.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_periods {
    /// Made by moistair_periods_new.
    pub words: [u64; 17],
}

/// How the books of a process or plant closed over time. Zeroed at first; may be copied and stored, not looked into.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_books_total {
    /// Zero at first.
    pub words: [u64; 15],
}

/// The residuals of one book.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_residuals {
    /// Sum of the absolute residuals, in the unit of the book.
    pub sum_of_residuals: f64,
    /// Sum of the scales, in the unit of the book.
    pub sum_of_scales: f64,
    /// Largest residual relative to its own scale.
    pub largest_relative: f64,
    /// The same in units of the rounding of numbers, 2^-52: a book of a few terms that closes leaves a few of them.
    pub largest_in_epsilons: f64,
    /// Sum of residuals over sum of scales; 0 without scales.
    pub relative: f64,
    /// Residuals that were added.
    pub samples: u64,
    /// Residuals that were refused.
    pub refused: u64,
}

/// What the books have come to.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_books_total_values {
    /// The heat book [W].
    pub heat: moistair_residuals,
    /// The water book [kg/s].
    pub water: moistair_residuals,
    /// Books that closed to rounding.
    pub closed: u64,
}

/// Measured less computed over many samples. Zeroed at first; may be copied and stored, not looked into.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_deviation {
    /// Zero at first.
    pub words: [u64; 8],
}

/// What a deviation has come to, in the unit of the values; NaN without samples.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_deviation_values {
    /// Mean, the bias of the measurement.
    pub mean: f64,
    /// Root of the mean square.
    pub root_mean_square: f64,
    /// Lowest, with its sign.
    pub lowest: f64,
    /// Highest, with its sign.
    pub highest: f64,
    /// Pairs that were taken.
    pub samples: u64,
    /// Pairs that were refused.
    pub refused: u64,
}

/// A structure of the core that the caller keeps as words.
trait Kept: Copy {
    type Core: Copy;
    fn to_core(self) -> Self::Core;
    fn from_core(core: Self::Core) -> Self;
}

/// The core's structures hold 8-byte numbers and pairs of 4-byte ones, no padding, and any bits are one of them.
macro_rules! kept {
    ($($name:ident: $core:ty;)*) => {$(
        impl Kept for $name {
            type Core = $core;
            fn to_core(self) -> $core {
                // SAFETY: of one size, numbers only, no padding.
                unsafe { transmute::<$name, $core>(self) }
            }
            fn from_core(core: $core) -> Self {
                // SAFETY: of one size, numbers only, no padding.
                unsafe { transmute::<$core, $name>(core) }
            }
        }
    )*};
}

kept! {
    moistair_counts: Counts;
    moistair_total: Total;
    moistair_periods: Periods;
    moistair_books_total: BooksTotal;
    moistair_deviation: Deviation;
}

/// What is kept in memory, changed: written back only on success.
unsafe fn change<K: Kept, T>(
    kept: *mut K,
    change: impl FnOnce(&mut K::Core) -> Result<T, Failure>,
) -> Result<T, Failure> {
    // SAFETY: the caller's pointer.
    let mut core = unsafe { read(kept) }?.to_core();
    let value = change(&mut core)?;
    // SAFETY: the caller's pointer.
    unsafe { write(kept, K::from_core(core)) };
    Ok(value)
}

/// Adds what is kept at `other`.
unsafe fn merge<K: Kept>(
    kept: *mut K,
    other: *const K,
    error: *mut moistair_error,
    merge: impl FnOnce(&mut K::Core, &K::Core) -> bool,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        unsafe {
            let other = read(other)?.to_core();
            change(kept, |core| if merge(core, &other) { Ok(()) } else { Err(Failure::Overflow) })
        }
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

impl From<Period> for moistair_period {
    fn from(period: Period) -> Self {
        Self { start: period.start, total: moistair_total::from_core(period.total) }
    }
}

impl From<&Residuals> for moistair_residuals {
    fn from(book: &Residuals) -> Self {
        Self {
            sum_of_residuals: book.sum_of_residuals(),
            sum_of_scales: book.sum_of_scales(),
            largest_relative: book.largest_relative(),
            largest_in_epsilons: book.largest_in_epsilons(),
            relative: book.relative(),
            samples: book.samples(),
            refused: book.refused(),
        }
    }
}

impl From<moistair_books> for Books {
    fn from(books: moistair_books) -> Self {
        Self {
            heat_residual: HeatFlow::from_watts(books.heat_residual),
            heat_scale: HeatFlow::from_watts(books.heat_scale),
            water_residual: MassFlow::from_kilograms_per_second(books.water_residual),
            water_scale: MassFlow::from_kilograms_per_second(books.water_scale),
            heat_resolution: HeatFlow::from_watts(books.heat_resolution),
        }
    }
}

/// Numbers that the library cannot have written are not handed out.
fn sound<T>(values: T, numbers: &[f64], optional: &[f64], known: bool) -> Result<T, Failure> {
    let mut numbers = numbers.iter().chain(if known { optional } else { &[] });
    if numbers.all(|number| number.is_finite()) { Ok(values) } else { Err(Failure::Damaged) }
}

impl Answer for moistair_total {
    fn is_finite(&self) -> bool {
        true
    }
}

impl Answer for moistair_periods {
    fn is_finite(&self) -> bool {
        true
    }
}

impl Answer for moistair_period {
    fn is_finite(&self) -> bool {
        self.start.is_finite()
    }
}

/// Whether a number is finite is known to `sound` already.
macro_rules! sound_answers {
    ($($name:ident),*) => {$(
        impl Answer for $name {
            fn is_finite(&self) -> bool {
                true
            }
        }
    )*};
}
sound_answers!(moistair_total_values, moistair_books_total_values, moistair_deviation_values);

/// Counts a checked sample.
///
/// counts: read and written; checked: the sample; error: may be null.
/// Returns 0, 101, 102, 103, 106.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_counts_record(
    counts: *mut moistair_counts,
    checked: *const moistair_checked,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        unsafe {
            let checked = read(checked)?.to_core()?;
            change(counts, |counts| {
                counts.record(&checked);
                Ok(())
            })
        }
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

/// Adds the counts of another time or channel.
///
/// counts: read and written; other: what is added; error: may be null.
/// Returns 0, 101, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_counts_merge(
    counts: *mut moistair_counts,
    other: *const moistair_counts,
    error: *mut moistair_error,
) -> i32 {
    let add = |counts: &mut Counts, other: &Counts| {
        counts.merge(other);
        true
    };
    // SAFETY: the caller's pointers.
    unsafe { merge(counts, other, error, add) }
}

fn empty_total(rule: i32, longest_step: f64) -> Result<Total, Failure> {
    let rule = Rule::from_code(rule).ok_or(Failure::UnknownSelector(rule))?;
    if longest_step.is_nan() {
        return Err(Failure::NotFinite);
    }
    Ok(Total::new(rule, longest_step))
}

/// An empty total.
///
/// rule: what the rate does between two samples, MOISTAIR_RULE_…; longest_step: the longest time between samples that is bridged [s],
/// infinity bridges all; total: output; error: may be null.
/// Returns 0, 101, 102, 103, 201.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_total_new(
    rule: i32,
    longest_step: f64,
    total: *mut moistair_total,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(moistair_total::from_core(empty_total(rule, longest_step)?));
    // SAFETY: the caller's pointers.
    unsafe { answer(total, error, call) }
}

/// Adds the next sample of a rate. A rate that is refused or not finite leaves a hole, none of it counted as zero.
///
/// total: read and written; time: [s] since any fixed instant; rate: in any unit; quality: how far it can be trusted, MOISTAIR_QUALITY_…; added:
/// output, what became of the time before the sample, MOISTAIR_ADDED_…, may be null; error: may be null.
/// Returns 0, 101, 102, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_total_add(
    total: *mut moistair_total,
    time: f64,
    rate: f64,
    quality: i32,
    added: *mut i32,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        check_optional(added)?;
        let quality = self::quality(quality)?;
        // SAFETY: the caller's pointers.
        unsafe {
            let outcome = change(total, |total| Ok(total.add(time, rate, quality)))?;
            write(added, outcome.code());
        }
        Ok(())
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

/// Adds a total of another time or place: hours into a day.
///
/// total: read and written; other: what is added; error: may be null.
/// Returns 0, 101, 103, 302.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_total_merge(
    total: *mut moistair_total,
    other: *const moistair_total,
    error: *mut moistair_error,
) -> i32 {
    // SAFETY: the caller's pointers.
    unsafe { merge(total, other, error, Total::merge) }
}

/// What a total has come to.
///
/// total: a total; values: output; error: may be null.
/// Returns 0, 101, 103, 106.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_total_read(
    total: *const moistair_total,
    values: *mut moistair_total_values,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointer.
        let total = unsafe { read(total) }?.to_core();
        let values = moistair_total_values {
            total: total.total(),
            positive: total.positive(),
            negative: total.negative(),
            mean: total.mean().unwrap_or(NAN),
            lowest: total.lowest().unwrap_or(NAN),
            highest: total.highest().unwrap_or(NAN),
            covered_seconds: total.covered_seconds(),
            repaired_seconds: total.repaired_seconds(),
            elapsed_seconds: total.elapsed_seconds(),
            coverage: total.coverage(),
        };
        let sums = [values.total, values.positive, values.negative];
        sound(values, &sums, &[values.mean, values.lowest, values.highest], total.mean().is_some())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(values, error, call) }
}

/// Covered time over a duration that the caller knows: a day, of which a total may have seen a part.
///
/// total: a total; duration: [s]; coverage: output [1], 0 for a duration that is not above zero; error: may be null.
/// Returns 0, 101, 103, 201 (duration or result not finite).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_total_coverage_of(
    total: *const moistair_total,
    duration: f64,
    coverage: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointer.
        let coverage = unsafe { read(total) }?.to_core().coverage_of(duration);
        if duration.is_finite() && coverage.is_finite() { Ok(coverage) } else { Err(Failure::NotFinite) }
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(coverage, error, call) }
}

/// Periods of a length, each beginning at a multiple of it, so that hours of Unix time are hours of UTC.
///
/// length: [s], 0.001 to 1e11; rule, longest_step: as for moistair_total_new; periods: output; error: may be null.
/// Returns 0, 101, 102, 103, 201.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_periods_new(
    length: f64,
    rule: i32,
    longest_step: f64,
    periods: *mut moistair_periods,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        if !length.is_finite() {
            return Err(Failure::NotFinite);
        }
        Ok(moistair_periods::from_core(Periods::new(length, empty_total(rule, longest_step)?)))
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(periods, error, call) }
}

/// Adds the next sample of a rate, as moistair_total_add does.
///
/// periods: read and written; time: [s]; rate: in any unit; quality: MOISTAIR_QUALITY_…; period: output, the finished period when this sample
/// is the first beyond it, else left alone; finished: output, 1 if there is one, else 0; error: may be null.
/// Returns 0, 101, 102, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_periods_add(
    periods: *mut moistair_periods,
    time: f64,
    rate: f64,
    quality: i32,
    period: *mut moistair_period,
    finished: *mut i32,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        check(period)?;
        check(finished)?;
        let quality = self::quality(quality)?;
        // SAFETY: the caller's pointers.
        unsafe {
            let done = change(periods, |periods| Ok(periods.add(time, rate, quality)))?;
            write(finished, done.is_some().into());
            done.into_iter().for_each(|done| write(period, done.into()));
        }
        Ok(())
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

/// The period that is not finished yet, as if it ended without another sample.
///
/// periods: the periods; period: output, left alone if no time has passed in it; begun: output, 1 if some has, else 0; error: may be null.
/// Returns 0, 101, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_periods_unfinished(
    periods: *const moistair_periods,
    period: *mut moistair_period,
    begun: *mut i32,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        check(period)?;
        check(begun)?;
        // SAFETY: the caller's pointers.
        unsafe {
            let unfinished = read(periods)?.to_core().unfinished();
            write(begun, unfinished.is_some().into());
            unfinished.into_iter().for_each(|unfinished| write(period, unfinished.into()));
        }
        Ok(())
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

/// Adds the books of a process; books that are not finite are only counted as refused.
///
/// total: read and written; books: from moistair_books_balance; error: may be null.
/// Returns 0, 101, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_books_total_record(
    total: *mut moistair_books_total,
    books: *const moistair_books,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        unsafe {
            let books = Books::from(read(books)?);
            change(total, |total| {
                total.record(&books);
                Ok(())
            })
        }
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

/// Adds the books of another time or place.
///
/// total: read and written; other: what is added; error: may be null.
/// Returns 0, 101, 103, 302.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_books_total_merge(
    total: *mut moistair_books_total,
    other: *const moistair_books_total,
    error: *mut moistair_error,
) -> i32 {
    // SAFETY: the caller's pointers.
    unsafe { merge(total, other, error, BooksTotal::merge) }
}

/// What the books have come to.
///
/// total: the books; values: output; error: may be null.
/// Returns 0, 101, 103, 106.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_books_total_read(
    total: *const moistair_books_total,
    values: *mut moistair_books_total_values,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointer.
        let total = unsafe { read(total) }?.to_core();
        let (heat, water) = (moistair_residuals::from(total.heat()), moistair_residuals::from(total.water()));
        let of = |book: moistair_residuals| {
            [book.sum_of_residuals, book.sum_of_scales, book.largest_in_epsilons, book.relative]
        };
        let values = moistair_books_total_values { heat, water, closed: total.closed() };
        sound(values, &of(heat), &of(water), true)
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(values, error, call) }
}

/// Takes a measured and a computed value in one unit; a pair that is not finite is only counted as refused.
///
/// deviation: read and written; measured, computed: the pair; error: may be null.
/// Returns 0, 101, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_deviation_add(
    deviation: *mut moistair_deviation,
    measured: f64,
    computed: f64,
    error: *mut moistair_error,
) -> i32 {
    let add = |deviation: &mut Deviation| {
        deviation.add(measured, computed);
        Ok(())
    };
    // SAFETY: the caller's pointers.
    unsafe { report(error, || change(deviation, add)) }
}

/// Adds the deviations of another time.
///
/// deviation: read and written; other: what is added; error: may be null.
/// Returns 0, 101, 103, 302.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_deviation_merge(
    deviation: *mut moistair_deviation,
    other: *const moistair_deviation,
    error: *mut moistair_error,
) -> i32 {
    // SAFETY: the caller's pointers.
    unsafe { merge(deviation, other, error, Deviation::merge) }
}

/// What a deviation has come to.
///
/// deviation: the deviation; values: output; error: may be null.
/// Returns 0, 101, 103, 106.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_deviation_read(
    deviation: *const moistair_deviation,
    values: *mut moistair_deviation_values,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointer.
        let core = unsafe { read(deviation) }?.to_core();
        let values = moistair_deviation_values {
            mean: core.mean().unwrap_or(NAN),
            root_mean_square: core.root_mean_square().unwrap_or(NAN),
            lowest: core.lowest().unwrap_or(NAN),
            highest: core.highest().unwrap_or(NAN),
            samples: core.samples(),
            refused: core.refused(),
        };
        let numbers = [values.mean, values.root_mean_square, values.lowest, values.highest];
        sound(values, &[], &numbers, core.mean().is_some())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(values, error, call) }
}

const _: () = {
    assert!(MOISTAIR_QUALITY_SLOTS == QUALITY_SLOTS && MOISTAIR_REASON_SLOTS == REASON_SLOTS);
    assert!(Quality::ALL.len() <= QUALITY_SLOTS);
    assert!(core::mem::offset_of!(moistair_period, total) == 8 && size_of::<moistair_residuals>() == 56);
};
