//! Totals of hours and days.

use super::{Total, total::Sample};
use crate::signal::{LONGEST_TIME, Quality, Tick, microseconds, seconds};

/// The shortest period, s.
pub const SHORTEST_PERIOD: f64 = 1e-3;

/// A finished period.
#[repr(C)]
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Period {
    /// When it began, s.
    pub start: f64,
    /// Its total. Its elapsed time is the whole period, whenever the first sample came.
    pub total: Total,
}

/// Cuts a total at the multiples of a period: hours, days, demand windows; owned by the caller.
///
/// The span between two samples that lie on either side of a boundary is shared out by the rule. A span that is longer
/// than a period is a gap. Periods that lie in a gap as a whole are not reported, so that a sample finishes one period
/// at most and takes bounded time; [`Total::coverage_of`] judges a merged total against the time that it should cover.
///
/// ```
/// use moistair_core::{account::{Periods, Rule, Total}, signal::Quality};
/// let mut hours = Periods::new(3600.0, Total::new(Rule::Step, 1800.0));
/// assert!(hours.add(1800.0, 10.0, Quality::Good).is_none());
/// assert!(hours.add(3000.0, 20.0, Quality::Good).is_none());
/// let hour = hours.add(4200.0, 30.0, Quality::Good).unwrap();
/// assert_eq!((hour.start, hour.total.mean(), hour.total.coverage()), (0.0, Some(40.0 / 3.0), 0.5));
/// assert_eq!(hours.current().total(), 20.0 * 600.0);
/// // A time that does not increase changes nothing.
/// assert!(hours.add(4200.0, 1e9, Quality::Good).is_none());
/// ```
#[repr(C)]
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Periods {
    current: Total,
    start: i64,
    length: i64,
}

impl Periods {
    /// Periods of this length, s, each beginning at a multiple of it, so that hours of Unix time are hours of UTC. The
    /// total brings its rule and its longest step; a length outside [`SHORTEST_PERIOD`] … [`LONGEST_TIME`] is taken
    /// as the nearer of them, NaN as the shorter.
    #[must_use]
    pub fn new(length: f64, empty: Total) -> Self {
        // Not `clamp`: NaN becomes the shortest.
        let length = if length > SHORTEST_PERIOD { length } else { SHORTEST_PERIOD };
        let length = microseconds(length.min(LONGEST_TIME));
        Self { current: Total::new(empty.rule(), empty.longest_step()), start: 0, length: length.unwrap_or(1) }
    }

    /// Takes the next sample, as [`Total::add`] does; the finished period when this sample is the first beyond it.
    pub fn add(&mut self, time: f64, rate: f64, quality: Quality) -> Option<Period> {
        let next = Sample::new(rate, quality);
        let tick = self.current.clock().step(time);
        let now = self.current.clock().now();
        match tick {
            Tick::Invalid | Tick::NotIncreasing => None,
            Tick::First => {
                self.begin(self.current, now, next);
                None
            }
            _ if self.start_of(now) == self.start => {
                self.current.take(tick, next);
                None
            }
            Tick::Forward { microseconds } => Some(self.cross(microseconds, now, next)),
            Tick::Restarted => {
                let finished = self.finished();
                self.begin(self.current.continued(), now, next);
                Some(finished)
            }
        }
    }

    /// The period that is not finished yet, as if nothing more came: what is left of it passes without being counted.
    /// `None` when no time of it has passed.
    ///
    /// ```
    /// use moistair_core::{account::{Periods, Rule, Total}, signal::Quality};
    /// let mut hours = Periods::new(3600.0, Total::new(Rule::Step, 1800.0));
    /// assert!(hours.unfinished().is_none());
    /// hours.add(3600.0, 10.0, Quality::Good);
    /// assert!(hours.unfinished().is_none());
    /// hours.add(4500.0, 10.0, Quality::Good);
    /// let last = hours.unfinished().unwrap();
    /// assert_eq!((last.start, last.total.total(), last.total.coverage()), (3600.0, 9000.0, 0.25));
    /// ```
    #[must_use]
    pub fn unfinished(&self) -> Option<Period> {
        let mut period = self.finished();
        let now = period.total.clock().now();
        let begun = period.total.elapsed_seconds() > 0.0;
        period.total.pause(self.start.saturating_add(self.length).saturating_sub(now));
        begun.then_some(period)
    }

    /// The total of the period that is not finished yet.
    #[must_use]
    pub const fn current(&self) -> &Total {
        &self.current
    }

    /// When that began, s.
    #[must_use]
    pub fn start(&self) -> f64 {
        seconds(self.start)
    }

    /// Finishes the period before a sample beyond its end and begins the one that the sample lies in.
    fn cross(&mut self, microseconds: i64, now: i64, next: Sample) -> Period {
        let last = self.current.last();
        let after = now.saturating_sub(self.start.saturating_add(self.length));
        let before = microseconds.saturating_sub(after);
        if !self.current.bridges(microseconds) || microseconds > self.length {
            self.current.pause(before);
            let finished = self.finished();
            self.begin(self.current.continued(), now, next);
            return finished;
        }
        let share = before as f64 / microseconds as f64;
        let boundary = Sample::between(self.current.rule(), last, next, share);
        self.current.span(before, last, boundary);
        let finished = self.finished();
        self.start = self.start.saturating_add(self.length);
        self.current = self.current.continued();
        self.current.span(after, boundary, next);
        self.current.keep(next);
        finished
    }

    /// Begins the period of a sample that nothing before it reaches.
    fn begin(&mut self, mut empty: Total, now: i64, next: Sample) {
        self.start = self.start_of(now);
        empty.pause(now.saturating_sub(self.start));
        empty.keep(next);
        self.current = empty;
    }

    fn finished(&self) -> Period {
        Period { start: self.start(), total: self.current }
    }

    /// The beginning of the period that a time lies in.
    fn start_of(&self, now: i64) -> i64 {
        now.saturating_sub(now.checked_rem_euclid(self.length).unwrap_or(0))
    }
}
