//! How many samples of which quality.

use crate::signal::{Checked, Quality, Reason};

/// Places for counts by reason; the code of a reason is its place. Larger than the reasons there are.
pub const REASON_SLOTS: usize = 32;

/// Places for counts by quality; the code of a quality is its place.
pub const QUALITY_SLOTS: usize = 4;

/// Counts of checked samples by quality and by reason; owned by the caller, zeroed at first.
///
/// ```
/// use moistair_core::account::Counts;
/// use moistair_core::signal::{Channel, ChannelState, Quality, Reason};
/// let (channel, mut state, mut counts) = (Channel::temperature(-40.0, 60.0), ChannelState::default(), Counts::default());
/// counts.record(&channel.check(&mut state, 0.0, 21.5));
/// counts.record(&channel.check(&mut state, 60.0, -999.0));
/// assert_eq!((counts.quality(Quality::Good), counts.reason(Reason::BelowRange), counts.samples()), (1, 1, 2));
/// assert_eq!(counts.share(Quality::Refused), 0.5);
/// ```
#[repr(C)]
#[derive(Clone, Copy, Debug, Default, PartialEq, Eq)]
pub struct Counts {
    by_quality: [u64; QUALITY_SLOTS],
    by_reason: [u64; REASON_SLOTS],
    held_by_cause: [u64; REASON_SLOTS],
    after_gap: u64,
}

impl Counts {
    /// Counts a sample.
    pub fn record(&mut self, checked: &Checked) {
        increment(&mut self.by_quality, checked.quality().code());
        increment(&mut self.by_reason, checked.reason().code());
        if checked.reason() == Reason::Held {
            increment(&mut self.held_by_cause, checked.cause().code());
        }
        self.after_gap = self.after_gap.saturating_add(checked.after_gap().into());
    }

    /// Adds the counts of another time or channel.
    pub fn merge(&mut self, other: &Self) {
        add(&mut self.by_quality, &other.by_quality);
        add(&mut self.by_reason, &other.by_reason);
        add(&mut self.held_by_cause, &other.held_by_cause);
        self.after_gap = self.after_gap.saturating_add(other.after_gap);
    }

    /// All samples.
    #[must_use]
    pub fn samples(&self) -> u64 {
        self.by_quality.iter().fold(0, |sum, count| sum.saturating_add(*count))
    }

    /// Samples of this quality.
    #[must_use]
    pub fn quality(&self, quality: Quality) -> u64 {
        read(&self.by_quality, quality.code())
    }

    /// Samples with this reason.
    #[must_use]
    pub fn reason(&self, reason: Reason) -> u64 {
        read(&self.by_reason, reason.code())
    }

    /// Samples that were refused for this cause and filled with the last good value.
    #[must_use]
    pub fn held_because(&self, cause: Reason) -> u64 {
        read(&self.held_by_cause, cause.code())
    }

    /// Gaps.
    #[must_use]
    pub const fn gaps(&self) -> u64 {
        self.after_gap
    }

    /// The share of this quality in all samples, 0 to 1; 0 without samples.
    #[must_use]
    pub fn share(&self, quality: Quality) -> f64 {
        let samples = self.samples();
        if samples > 0 { self.quality(quality) as f64 / samples as f64 } else { 0.0 }
    }
}

fn increment(counts: &mut [u64], code: i32) {
    if let Some(count) = usize::try_from(code).ok().and_then(|place| counts.get_mut(place)) {
        *count = count.saturating_add(1);
    }
}

fn read(counts: &[u64], code: i32) -> u64 {
    usize::try_from(code).ok().and_then(|place| counts.get(place)).copied().unwrap_or(0)
}

fn add(counts: &mut [u64], others: &[u64]) {
    for (count, other) in counts.iter_mut().zip(others) {
        *count = count.saturating_add(*other);
    }
}
