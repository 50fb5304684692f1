//! The check of one sample.

use super::channel::{GAP_INTERVALS, HIGHEST_RELATIVE_HUMIDITY, SLIP_HIGHEST_FRACTION, SLIP_REACH, SLIP_SECONDS};
use super::{Channel, Clock, Kind, Quality, Reason, Tick, Unit, clock};

/// A checked sample.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct Checked {
    value: f64,
    quality: Quality,
    reason: Reason,
    cause: Reason,
    after_gap: u32,
}

impl Checked {
    /// The value in the unit of the core; `None` when refused. Always finite and within the limits of the channel.
    #[must_use]
    pub fn value(&self) -> Option<f64> {
        (self.quality != Quality::Refused).then_some(self.value)
    }

    /// The value, or this substitute when refused.
    #[must_use]
    pub fn value_or(&self, substitute: f64) -> f64 {
        self.value().unwrap_or(substitute)
    }

    /// How far it can be trusted.
    #[must_use]
    pub const fn quality(&self) -> Quality {
        self.quality
    }

    /// Why.
    #[must_use]
    pub const fn reason(&self) -> Reason {
        self.reason
    }

    /// What was wrong with the reading: the reason itself, unless that is [`Reason::Held`].
    #[must_use]
    pub const fn cause(&self) -> Reason {
        self.cause
    }

    /// Whether a gap lies before this sample, whatever its quality: nothing may be integrated across it.
    #[must_use]
    pub const fn after_gap(&self) -> bool {
        self.after_gap != 0
    }

    /// The same sample from its parts, as they come back from C; `None` when a code is none, or when a sample that is
    /// not refused has no finite value.
    #[must_use]
    pub const fn from_codes(value: f64, quality: i32, reason: i32, cause: i32, after_gap: bool) -> Option<Self> {
        match (Quality::from_code(quality), Reason::from_code(reason), Reason::from_code(cause)) {
            (Some(quality), Some(reason), Some(cause)) if value.is_finite() || matches!(quality, Quality::Refused) => {
                Some(Self { value, quality, reason, cause, after_gap: after_gap as u32 })
            }
            _ => None,
        }
    }

    const fn refused(cause: Reason, after_gap: bool) -> Self {
        let quality = Quality::Refused;
        Self { value: f64::NAN, quality, reason: cause, cause, after_gap: after_gap as u32 }
    }

    const fn held(value: f64, cause: Reason, after_gap: bool) -> Self {
        let quality = Quality::Repaired;
        Self { value, quality, reason: Reason::Held, cause, after_gap: after_gap as u32 }
    }

    const fn accepted(value: f64, remark: Reason, after_gap: bool) -> Self {
        let (quality, reason) = match (remark, after_gap) {
            (Reason::Ok, false) => (Quality::Good, Reason::Ok),
            (Reason::Ok, true) => (Quality::Good, Reason::Gap),
            _ => (Quality::Repaired, remark),
        };
        Self { value, quality, reason, cause: reason, after_gap: after_gap as u32 }
    }
}

/// What a channel remembers from sample to sample; owned by the caller, zeroed at first.
///
/// Any bits are a state: a damaged one may misjudge some samples and then recovers.
#[repr(C)]
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct ChannelState {
    clock: Clock,
    good: f64,
    good_time: i64,
    steady: f64,
    reference: f64,
    slip_raw: f64,
    slip_highest: f64,
    slip_since: i64,
    unchanged: u32,
    slip_count: u32,
    has_good: u32,
    has_reference: u32,
}

impl ChannelState {
    /// The last good value, in the unit of the core, and its time, s.
    #[must_use]
    pub fn last_good(&self) -> Option<(f64, f64)> {
        (self.has_good != 0).then(|| (self.good, clock::seconds(self.good_time)))
    }

    /// Notes the value for the stuck rule; whether it is stuck.
    fn is_stuck(&mut self, channel: &Channel, value: f64, reference: Option<f64>) -> bool {
        let reference_moved = self.reference_moved(channel, reference);
        let same = (value - self.steady).abs() <= channel.resolution;
        if self.unchanged == 0 || !same {
            (self.steady, self.unchanged) = (value, 1);
        } else if reference_moved {
            self.unchanged = self.unchanged.saturating_add(1);
        }
        channel.stuck_samples > 1 && self.unchanged >= channel.stuck_samples
    }

    /// Whether this sample counts for the stuck rule: always without a reference, else when that has moved.
    fn reference_moved(&mut self, channel: &Channel, reference: Option<f64>) -> bool {
        let Some(reference) = reference else { return true };
        if !reference.is_finite() {
            return false;
        }
        let (known, near) =
            (self.has_reference != 0, (reference - self.reference).abs() <= channel.reference_resolution);
        if !(known && near) {
            (self.reference, self.has_reference) = (reference, 1);
        }
        known && !near
    }

    /// Notes a raw reading in percent; whether the readings are fractions after all.
    ///
    /// A single low reading is legitimate, and zero is the same in both. Evidence is a long row that moves, never
    /// exceeds [`SLIP_HIGHEST_FRACTION`] and reaches [`SLIP_REACH`].
    fn looks_like_fraction(&mut self, channel: &Channel, raw: f64) -> bool {
        if raw > SLIP_HIGHEST_FRACTION {
            self.slip_count = 0;
            return false;
        }
        let moved = (raw - self.slip_raw).abs() > 0.0;
        self.slip_raw = raw;
        if self.slip_count == 0 {
            (self.slip_since, self.slip_highest) = (self.clock.now(), 0.0);
        }
        if raw > 0.0 && moved {
            self.slip_count = self.slip_count.saturating_add(1);
            self.slip_highest = self.slip_highest.max(raw);
        }
        channel.slip_samples > 0
            && self.slip_count >= channel.slip_samples
            && self.slip_highest >= SLIP_REACH
            && self.age(self.slip_since) >= SLIP_SECONDS
    }

    /// Seconds from `since` to now.
    fn age(&self, since: i64) -> f64 {
        clock::seconds(self.clock.now().saturating_sub(since))
    }

    /// Forgets what was dated by a clock that has since been set back.
    fn forget_times(&mut self) {
        (self.has_good, self.slip_count) = (0, 0);
    }
}

impl Channel {
    /// Checks one sample: a time, s since any fixed instant, and a raw reading in the unit of the channel, NaN when
    /// there is none.
    ///
    /// The value that comes back is converted to the unit of the core. No sample, however wrong, spoils a later one.
    ///
    /// ```
    /// use moistair_core::signal::{Channel, ChannelState, Quality, Reason};
    /// let channel = Channel::relative_humidity_percent().with_interval(60.0).with_hold(120.0);
    /// let mut state = ChannelState::default();
    ///
    /// let good = channel.check(&mut state, 0.0, 45.0);
    /// assert_eq!((good.value(), good.quality()), (Some(0.45), Quality::Good));
    ///
    /// let wet = channel.check(&mut state, 60.0, 101.2);
    /// assert_eq!((wet.value(), wet.reason()), (Some(1.0), Reason::AboveSaturation));
    ///
    /// let absent = channel.check(&mut state, 120.0, f64::NAN);
    /// assert_eq!((absent.value(), absent.reason(), absent.cause()), (Some(1.0), Reason::Held, Reason::Missing));
    ///
    /// let wrong = channel.check(&mut state, 1000.0, 150.0);
    /// assert_eq!((wrong.value(), wrong.reason(), wrong.after_gap()), (None, Reason::AboveRange, true));
    /// ```
    #[must_use]
    pub fn check(&self, state: &mut ChannelState, time: f64, raw: f64) -> Checked {
        self.judge(state, time, raw, None)
    }

    /// [`check`](Self::check) beside a reference: a sample counts as unchanged only when the reference has moved by more
    /// than its resolution ([`with_reference_resolution`](Self::with_reference_resolution)) since it last did, so that
    /// a plant at rest does not look stuck. A reference that is not finite has not moved.
    #[must_use]
    pub fn check_beside(&self, state: &mut ChannelState, time: f64, raw: f64, reference: f64) -> Checked {
        self.judge(state, time, raw, Some(reference))
    }

    fn judge(&self, state: &mut ChannelState, time: f64, raw: f64, reference: Option<f64>) -> Checked {
        let Some((kind, unit)) = self.decode() else { return Checked::refused(Reason::ChannelInvalid, false) };
        let gap = match state.clock.step(time) {
            Tick::First => false,
            Tick::Forward { microseconds } => {
                self.interval > 0.0 && clock::seconds(microseconds) > GAP_INTERVALS * self.interval
            }
            Tick::Restarted => {
                state.forget_times();
                true
            }
            Tick::NotIncreasing => return Checked::refused(Reason::TimeNotIncreasing, false),
            Tick::Invalid => return Checked::refused(Reason::TimeInvalid, false),
        };
        let (value, remark) = match self.convert(kind, unit, raw) {
            Ok(converted) => converted,
            Err(cause) => return self.fill(state, cause, gap),
        };
        // The stuck rule looks at the reading, not at what saturation clipped it to.
        let stuck = state.is_stuck(self, unit.to_core(raw), reference);
        let fractions = unit == Unit::Percent && state.looks_like_fraction(self, raw);
        if stuck || fractions {
            state.has_good = 0;
            return Checked::refused(if fractions { Reason::LooksLikeFraction } else { Reason::Stuck }, gap);
        }
        (state.good, state.good_time, state.has_good) = (value, state.clock.now(), 1);
        Checked::accepted(value, remark, gap)
    }

    /// The reading in the unit of the core, clipped to saturation, with a remark; or why it is refused.
    fn convert(&self, kind: Kind, unit: Unit, raw: f64) -> Result<(f64, Reason), Reason> {
        let value = unit.to_core(raw);
        if value.is_nan() {
            return Err(Reason::Missing);
        }
        let above_saturation = kind == Kind::RelativeHumidity && 1.0 < value && value <= HIGHEST_RELATIVE_HUMIDITY;
        let (value, remark) = if above_saturation { (1.0, Reason::AboveSaturation) } else { (value, Reason::Ok) };
        if self.contains(value) {
            return Ok((value, remark));
        }
        let plain = if value < self.min() { Reason::BelowRange } else { Reason::AboveRange };
        Err(self.likely_slip(kind, unit, raw, plain))
    }

    /// The last good value while it is young enough, else nothing.
    fn fill(&self, state: &ChannelState, cause: Reason, gap: bool) -> Checked {
        // The limits may have been changed since.
        if state.has_good != 0 && state.age(state.good_time) <= self.hold && self.contains(state.good) {
            return Checked::held(state.good, cause, gap);
        }
        Checked::refused(cause, gap)
    }
}
