//! How far a measured and a computed value lie apart.

use super::Sum;
use crate::real::Real;

/// Measured minus computed over many samples: bias and scatter of a sensor against what the others say; owned by the
/// caller, zeroed at first.
///
/// ```
/// use moistair_core::account::Deviation;
/// let mut mixed = Deviation::default();
/// for (measured, computed) in [(21.0, 20.0), (22.0, 20.0)] {
///     assert!(mixed.add(measured, computed));
/// }
/// assert_eq!((mixed.mean(), mixed.lowest(), mixed.highest()), (Some(1.5), Some(1.0), Some(2.0)));
/// assert_eq!(mixed.root_mean_square(), Some(2.5_f64.sqrt()));
/// // A missing value has no deviation.
/// assert!(!mixed.add(f64::NAN, 20.0));
/// assert_eq!((mixed.samples(), mixed.refused()), (2, 1));
/// ```
#[repr(C)]
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Deviation {
    sum: Sum,
    squares: Sum,
    lowest: f64,
    highest: f64,
    samples: u64,
    refused: u64,
}

impl Deviation {
    /// Takes a pair in one unit. False, and only counted as refused, when either is not finite, or their difference or its
    /// square would not be.
    pub fn add(&mut self, measured: f64, computed: f64) -> bool {
        // Adding zero makes −0 plain zero, so that extremes have one bit pattern.
        let difference = measured - computed + 0.0;
        let (mut sum, mut squares) = (self.sum, self.squares);
        let usable = sum.add(difference) && squares.add(difference * difference);
        if usable {
            let fresh = self.samples == 0;
            (self.sum, self.squares) = (sum, squares);
            self.lowest = if fresh { difference } else { self.lowest.min(difference) };
            self.highest = if fresh { difference } else { self.highest.max(difference) };
            self.samples = self.samples.saturating_add(1);
        } else {
            self.refused = self.refused.saturating_add(1);
        }
        usable
    }

    /// Adds the deviations of another time; false, and nothing changes, when a sum is not finite.
    pub fn merge(&mut self, other: &Self) -> bool {
        let mut merged = *self;
        let fits = merged.sum.merge(&other.sum) && merged.squares.merge(&other.squares);
        if fits {
            if let (Some(lowest), Some(highest)) = (other.lowest(), other.highest()) {
                merged.lowest = self.lowest().unwrap_or(lowest).min(lowest);
                merged.highest = self.highest().unwrap_or(highest).max(highest);
            }
            merged.samples = self.samples.saturating_add(other.samples);
            merged.refused = self.refused.saturating_add(other.refused);
            *self = merged;
        }
        fits
    }

    /// The mean, the bias of the measurement; `None` without samples.
    #[must_use]
    pub fn mean(&self) -> Option<f64> {
        self.known().then(|| self.sum.value() / self.samples as f64)
    }

    /// The root of the mean square; `None` without samples.
    #[must_use]
    pub fn root_mean_square(&self) -> Option<f64> {
        self.known().then(|| Real::sqrt(self.squares.value() / self.samples as f64))
    }

    /// The lowest, with its sign; `None` without samples.
    #[must_use]
    pub fn lowest(&self) -> Option<f64> {
        self.known().then_some(self.lowest)
    }

    /// The highest, with its sign; `None` without samples.
    #[must_use]
    pub fn highest(&self) -> Option<f64> {
        self.known().then_some(self.highest)
    }

    /// How many pairs were taken.
    #[must_use]
    pub const fn samples(&self) -> u64 {
        self.samples
    }

    /// How many were refused.
    #[must_use]
    pub const fn refused(&self) -> u64 {
        self.refused
    }

    const fn known(&self) -> bool {
        self.samples > 0
    }
}
