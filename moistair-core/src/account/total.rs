//! The total over time of a rate.

use super::Sum;
use crate::signal::coded::coded_enum;
use crate::signal::{Clock, Quality, Tick, seconds};

coded_enum! {
    /// What a rate does between two samples.
    Rule {
        /// It holds until the next sample: records on change of value, commands, counters.
        Step = 0, "step";
        /// It runs straight to the next sample: densely sampled, smooth signals.
        Trapezoid = 1, "trapezoid";
    }
}

coded_enum! {
    /// What became of the time before a sample.
    Added {
        /// The first sample: there is no time before it.
        Started = 0, "started";
        /// Counted.
        Counted = 1, "counted";
        /// Not counted: the rate that would have to cover it was refused.
        Hole = 2, "hole";
        /// Not counted: longer than the longest step, or the clock was set back.
        Gap = 3, "gap";
        /// The sample's time is not usable; the sample is ignored.
        TimeRefused = 4, "time refused";
        /// Not counted: the total would not be finite.
        Overflow = 5, "overflow";
    }
}

/// A rate and how far it can be trusted; no number, no trust.
#[derive(Clone, Copy)]
pub(super) struct Sample {
    rate: f64,
    quality: Quality,
}

impl Sample {
    pub(super) fn new(rate: f64, quality: Quality) -> Self {
        // Adding zero makes −0 plain zero, so that extremes have one bit pattern.
        if rate.is_finite() {
            Self { rate: rate + 0.0, quality }
        } else {
            Self { rate: 0.0, quality: Quality::Refused }
        }
    }

    /// The sample that a rule puts `share` of the way from one sample to the next.
    pub(super) fn between(rule: Rule, from: Self, to: Self, share: f64) -> Self {
        match rule {
            Rule::Step => from,
            Rule::Trapezoid => Self::new(from.rate * (1.0 - share) + to.rate * share, from.quality.worst(to.quality)),
        }
    }
}

/// The total of a rate over time (J from W, kg from kg/s), with its sign parts, its extremes and its coverage; owned by
/// the caller.
///
/// Add rates that were computed sample by sample, never a rate of averaged inputs: what moist air does is not linear.
/// The same structure gives the mean of a state: [`mean`](Self::mean) of a temperature has the unit of the temperature.
/// Zero bytes are a total that bridges nothing; start with [`new`](Self::new).
///
/// ```
/// use moistair_core::account::{Added, Rule, Total};
/// use moistair_core::signal::Quality;
/// // 2 kW for a minute, then −1 kW for a minute; then five minutes without a sample.
/// let mut heat = Total::new(Rule::Step, 90.0);
/// assert_eq!(heat.add(0.0, 2000.0, Quality::Good), Added::Started);
/// assert_eq!(heat.add(60.0, -1000.0, Quality::Good), Added::Counted);
/// assert_eq!(heat.add(120.0, 500.0, Quality::Good), Added::Counted);
/// assert_eq!(heat.add(420.0, 500.0, Quality::Good), Added::Gap);
/// assert_eq!((heat.total(), heat.positive(), heat.negative()), (60_000.0, 120_000.0, -60_000.0));
/// assert_eq!((heat.mean(), heat.coverage()), (Some(500.0), 120.0 / 420.0));
/// ```
#[repr(C)]
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Total {
    positive: Sum,
    negative: Sum,
    lowest: f64,
    highest: f64,
    rate: f64,
    longest_step: f64,
    covered: i64,
    repaired: i64,
    elapsed: i64,
    clock: Clock,
    rule: i32,
    quality: i32,
}

impl Total {
    /// An empty total that bridges steps up to `longest_step`, s; infinity bridges all, zero or NaN none.
    #[must_use]
    pub fn new(rule: Rule, longest_step: f64) -> Self {
        Self { rule: rule.code(), longest_step, ..Self::default() }
    }

    /// Takes the next sample: its time, s since any fixed instant, its rate, and whether that can be trusted. A rate
    /// that is refused or not finite leaves a hole, none of it counted as zero.
    pub fn add(&mut self, time: f64, rate: f64, quality: Quality) -> Added {
        let tick = self.clock.step(time);
        self.take(tick, Sample::new(rate, quality))
    }

    /// Takes a sample that the clock has placed.
    pub(super) fn take(&mut self, tick: Tick, next: Sample) -> Added {
        let added = match tick {
            Tick::Invalid | Tick::NotIncreasing => return Added::TimeRefused,
            Tick::First => Added::Started,
            Tick::Restarted => Added::Gap,
            Tick::Forward { microseconds } if self.bridges(microseconds) => self.span(microseconds, self.last(), next),
            Tick::Forward { microseconds } => self.pause(microseconds),
        };
        self.keep(next);
        added
    }

    /// Counts a span between two samples.
    pub(super) fn span(&mut self, microseconds: i64, from: Sample, to: Sample) -> Added {
        self.elapsed = self.elapsed.saturating_add(microseconds);
        let (end, quality) = match self.rule() {
            Rule::Step => (from.rate, from.quality),
            Rule::Trapezoid => (to.rate, from.quality.worst(to.quality)),
        };
        if quality == Quality::Refused {
            return Added::Hole;
        }
        if !self.integrate(seconds(microseconds), from.rate, end) {
            return Added::Overflow;
        }
        let fresh = self.covered == 0;
        self.lowest = if fresh { from.rate } else { self.lowest }.min(from.rate).min(end);
        self.highest = if fresh { from.rate } else { self.highest }.max(from.rate).max(end);
        self.covered = self.covered.saturating_add(microseconds);
        if quality == Quality::Repaired {
            self.repaired = self.repaired.saturating_add(microseconds);
        }
        Added::Counted
    }

    /// Lets time pass without counting it.
    pub(super) fn pause(&mut self, microseconds: i64) -> Added {
        self.elapsed = self.elapsed.saturating_add(microseconds);
        Added::Gap
    }

    /// Adds the area under a straight line, either sign to its part; false when that is not finite.
    fn integrate(&mut self, duration: f64, start: f64, end: f64) -> bool {
        let (a, b) = (0.5 * start, 0.5 * end);
        let (positive, negative) = match (a < 0.0, b < 0.0) {
            (false, false) => ((a + b) * duration, 0.0),
            (true, true) => (0.0, (a + b) * duration),
            // The line crosses zero after the share a / (a − b) of the duration.
            (false, true) => (a * (a / (a - b)) * duration, b * (b / (b - a)) * duration),
            (true, false) => (b * (b / (b - a)) * duration, a * (a / (a - b)) * duration),
        };
        let (mut up, mut down) = (self.positive, self.negative);
        let fits = up.add(positive) && down.add(negative);
        if fits {
            (self.positive, self.negative) = (up, down);
        }
        fits
    }

    /// Adds a total of another time or place, an hour to a day: sums, coverage and extremes. The time between the two
    /// is not counted. False, and nothing changes, when the sum is not finite.
    ///
    /// Covered and elapsed time are whole microseconds, so that the coverage of the merged total is that of one total
    /// kept throughout.
    pub fn merge(&mut self, other: &Self) -> bool {
        let mut merged = *self;
        let fits = merged.positive.merge(&other.positive) && merged.negative.merge(&other.negative);
        if !fits {
            return false;
        }
        if let (Some(lowest), Some(highest)) = (other.lowest(), other.highest()) {
            merged.lowest = self.lowest().unwrap_or(lowest).min(lowest);
            merged.highest = self.highest().unwrap_or(highest).max(highest);
        }
        merged.covered = self.covered.saturating_add(other.covered);
        merged.repaired = self.repaired.saturating_add(other.repaired);
        merged.elapsed = self.elapsed.saturating_add(other.elapsed);
        *self = merged;
        true
    }

    /// The total: rate × s.
    #[must_use]
    pub fn total(&self) -> f64 {
        let mut net = self.positive;
        net.merge(&self.negative);
        net.value()
    }

    /// The part with a positive rate, ≥ 0.
    #[must_use]
    pub const fn positive(&self) -> f64 {
        self.positive.value()
    }

    /// The part with a negative rate, ≤ 0.
    #[must_use]
    pub const fn negative(&self) -> f64 {
        self.negative.value()
    }

    /// The mean rate over the covered time; `None` when nothing is covered.
    #[must_use]
    pub fn mean(&self) -> Option<f64> {
        (self.covered > 0).then(|| self.total() / self.covered_seconds())
    }

    /// The lowest rate in the covered time; `None` when nothing is covered.
    #[must_use]
    pub fn lowest(&self) -> Option<f64> {
        (self.covered > 0).then_some(self.lowest)
    }

    /// The highest rate in the covered time, a peak demand; `None` when nothing is covered.
    #[must_use]
    pub fn highest(&self) -> Option<f64> {
        (self.covered > 0).then_some(self.highest)
    }

    /// The time that the total stands for, s.
    #[must_use]
    pub fn covered_seconds(&self) -> f64 {
        seconds(self.covered)
    }

    /// The part of the covered time that rests on repaired samples, s.
    #[must_use]
    pub fn repaired_seconds(&self) -> f64 {
        seconds(self.repaired)
    }

    /// The time from the first to the last sample, gaps included, s.
    #[must_use]
    pub fn elapsed_seconds(&self) -> f64 {
        seconds(self.elapsed)
    }

    /// Covered over elapsed time, 0 to 1; 0 when no time has passed.
    #[must_use]
    pub fn coverage(&self) -> f64 {
        self.coverage_of(self.elapsed_seconds())
    }

    /// Covered time over a duration that the caller knows, s: a day, of which a total may have seen a part.
    #[must_use]
    pub fn coverage_of(&self, duration: f64) -> f64 {
        if duration > 0.0 { self.covered_seconds() / duration } else { 0.0 }
    }

    /// What the rate does between two samples.
    #[must_use]
    pub fn rule(&self) -> Rule {
        Rule::from_code(self.rule).unwrap_or(Rule::Step)
    }

    /// The longest step that is bridged, s.
    #[must_use]
    pub const fn longest_step(&self) -> f64 {
        self.longest_step
    }

    /// Whether a step is short enough to be counted.
    pub(super) fn bridges(&self, microseconds: i64) -> bool {
        seconds(microseconds) <= self.longest_step
    }

    /// The clock.
    pub(super) fn clock(&mut self) -> &mut Clock {
        &mut self.clock
    }

    /// The sample before.
    pub(super) fn last(&self) -> Sample {
        Sample { rate: self.rate, quality: Quality::from_code(self.quality).unwrap_or(Quality::Refused) }
    }

    /// Makes a sample the one before.
    pub(super) fn keep(&mut self, sample: Sample) {
        (self.rate, self.quality) = (sample.rate, sample.quality.code());
    }

    /// An empty total that goes on from the last sample of this one.
    pub(super) fn continued(&self) -> Self {
        let empty = Self::new(self.rule(), self.longest_step);
        Self { clock: self.clock, rate: self.rate, quality: self.quality, ..empty }
    }
}
