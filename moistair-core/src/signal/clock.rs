//! The order of time stamps.

/// The largest time stamp taken, s on either side of zero: some 3000 years. Unix stamps in milliseconds lie beyond it.
/// Common practice, no source.
pub const LONGEST_TIME: f64 = 1e11;

/// This many samples in a row that follow each other, yet lie before the last accepted time, are believed: the clock
/// has been set back. Common practice, no source.
pub const RESTART_SAMPLES: u32 = 3;

const MICROSECONDS: f64 = 1e6;

/// Orders time stamps; owned by the caller, zeroed at first.
///
/// Time is kept in whole microseconds, so that differences and their sums are exact. One wrong stamp does no lasting
/// harm: a stamp from the far future makes the true ones look late, and after [`RESTART_SAMPLES`] of those the clock
/// goes on from them. A block of records that is there twice is taken for such a clock as well, and counts twice:
/// remove doubles from a log first.
///
/// ```
/// use moistair_core::signal::{Clock, Tick};
/// let mut clock = Clock::default();
/// assert_eq!(clock.step(1_700_000_000.0), Tick::First);
/// assert_eq!(clock.step(1_700_000_000.1), Tick::Forward { microseconds: 100_000 });
/// assert_eq!(clock.step(1_700_000_000.1), Tick::NotIncreasing);
/// assert_eq!(clock.step(f64::NAN), Tick::Invalid);
/// ```
#[repr(C)]
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub struct Clock {
    now: i64,
    candidate: i64,
    candidates: u32,
    started: u32,
}

/// What a time stamp means to a [`Clock`].
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Tick {
    /// The first one.
    First,
    /// Later than the one before.
    Forward {
        /// By this many microseconds, at least one.
        microseconds: i64,
    },
    /// Before the one before, but believed: the clock has been set back. Nothing spans it.
    Restarted,
    /// Not later than the one before; the clock stays.
    NotIncreasing,
    /// No number, or beyond [`LONGEST_TIME`]; the clock stays.
    Invalid,
}

impl Clock {
    /// Takes the next time stamp, s since any fixed instant, resolved to one microsecond.
    pub fn step(&mut self, time: f64) -> Tick {
        let Some(time) = microseconds(time) else { return Tick::Invalid };
        if self.started == 0 {
            *self = Self { now: time, started: 1, ..Self::default() };
            return Tick::First;
        }
        if time > self.now {
            let step = time.saturating_sub(self.now);
            *self = Self { now: time, started: 1, ..Self::default() };
            return Tick::Forward { microseconds: step };
        }
        self.candidates = if time > self.candidate { self.candidates.saturating_add(1) } else { 1 };
        self.candidate = time;
        if self.candidates < RESTART_SAMPLES {
            return Tick::NotIncreasing;
        }
        *self = Self { now: time, started: 1, ..Self::default() };
        Tick::Restarted
    }

    /// The last accepted time, s; `None` before the first.
    #[must_use]
    pub fn time(&self) -> Option<f64> {
        (self.started != 0).then(|| seconds(self.now))
    }

    #[cfg(test)]
    pub(crate) fn from_parts([now, candidate]: [i64; 2], [candidates, started]: [u32; 2]) -> Self {
        Self { now, candidate, candidates, started }
    }

    /// The last accepted time, µs.
    pub(crate) fn now(&self) -> i64 {
        self.now
    }
}

/// A time in whole microseconds, to the nearest; `None` when it is none.
pub(crate) fn microseconds(time: f64) -> Option<i64> {
    let scaled = time * MICROSECONDS;
    // The cast truncates: a half away from zero makes it round.
    (time.abs() <= LONGEST_TIME).then_some((scaled + 0.5_f64.copysign(scaled)) as i64)
}

/// Microseconds as seconds.
pub(crate) fn seconds(microseconds: i64) -> f64 {
    microseconds as f64 / MICROSECONDS
}
