//! The one bracketed root-finder, for problems whose work cannot be fixed beforehand.

use crate::real::{Scalar, k};

/// Evaluations at most. Halving alone exhausts the bits of an `f64` interval in fewer; Newton usually takes under ten.
pub const ITERATION_CAP: u32 = 80;

/// The root of an increasing function in `[low, high]`, by Newton where its step stays inside what is known to hold the root,
/// by halving elsewhere. `f` returns value and slope; a NaN value counts as positive (beyond the root).
///
/// Ends when the interval or the step no longer changes `x`; the value returned is then within a few units in the last
/// place of the root, or of the end of the bracket nearest to it.
pub fn increasing<S: Scalar>(low: S, high: S, f: impl Fn(S) -> (S, S)) -> S {
    let (mut low, mut high) = (low, high);
    let mut x = high;
    for _ in 0..ITERATION_CAP {
        let (value, slope) = f(x);
        if value == k(0.0) {
            return x;
        }
        if value < k(0.0) {
            low = x;
        } else {
            high = x;
        }
        let newton = x - value / slope;
        let next = if low < newton && newton < high { newton } else { low + (high - low) * k(0.5) };
        if next == x || !(low < next && next < high) {
            return x;
        }
        x = next;
    }
    x
}

#[cfg(test)]
mod tests {
    use super::*;

    /// Hostile shapes: flat then steep, infinite slope, NaN to the right, root at an end.
    #[test]
    fn finds_roots_of_hostile_shapes() {
        let cube = increasing(-1.0, 2.0, |x: f64| (x * x * x - 1e-3, 3.0 * x * x));
        assert!((cube - 0.1).abs() < 1e-15, "{cube}");
        let beyond = increasing(0.0, 10.0, |x: f64| if x > 3.0 { (f64::NAN, f64::NAN) } else { (x - 2.5, 1.0) });
        assert!((beyond - 2.5).abs() < 1e-15, "{beyond}");
        let zero_slope = increasing(0.0, 1.0, |x: f64| (x - 0.3, 0.0));
        assert!((zero_slope - 0.3).abs() < 1e-15, "{zero_slope}");
        assert_eq!(
            increasing(0.0, 1.0, |x: f64| (x + 1.0, 1.0)),
            f64::from_bits(increasing(0.0, 1.0, |x: f64| (x + 1.0, 1.0)).to_bits())
        );
        assert!(increasing(0.0, 1.0, |x: f64| (x + 1.0, 1.0)) < 1e-15);
        assert!((increasing(0.0, 1.0, |x: f64| (x - 7.0, 1.0)) - 1.0).abs() < 1e-15);
    }
}
