//! A sum that does not drift.

/// A compensated sum (Neumaier 1974, ZAMM 54, 39–51); zero bytes are zero.
///
/// The part that rounding takes from each addition is kept and added at the end, so that a hundred million small
/// increments come out to the last digit.
///
/// ```
/// use moistair_core::account::Sum;
/// let mut sum = Sum::default();
/// for x in [1.0, 1e100, 1.0, -1e100] {
///     assert!(sum.add(x));
/// }
/// assert_eq!(sum.value(), 2.0);
/// // What is no number, or would overflow, is not added.
/// assert!(!sum.add(f64::NAN));
/// assert_eq!(sum.value(), 2.0);
/// ```
#[repr(C)]
#[derive(Clone, Copy, Debug, Default, PartialEq)]
pub struct Sum {
    sum: f64,
    lost: f64,
}

impl Sum {
    /// Adds a term; false, and nothing changes, when the term or the new sum is not finite.
    pub fn add(&mut self, term: f64) -> bool {
        let sum = self.sum + term;
        if !sum.is_finite() {
            return false;
        }
        let (large, small) = if self.sum.abs() >= term.abs() { (self.sum, term) } else { (term, self.sum) };
        *self = Self { sum, lost: self.lost + ((large - sum) + small) };
        true
    }

    /// Adds another sum with what it keeps beside; false, and nothing changes, when the result is not finite.
    pub fn merge(&mut self, other: &Self) -> bool {
        let mut sum = *self;
        let fits = sum.add(other.sum) && sum.add(other.lost);
        if fits {
            *self = sum;
        }
        fits
    }

    /// The sum.
    #[must_use]
    pub const fn value(&self) -> f64 {
        self.sum + self.lost
    }
}
