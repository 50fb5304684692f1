//! Solves of fixed work, and the one bracketed root-finder for problems whose work cannot be fixed beforehand.

use crate::real::{Real, Scalar, k};

/// A fixed number of steps of a solve.
#[inline(always)]
pub fn repeated<R: Real>(steps: usize, start: R, step: impl Fn(R) -> R) -> R {
    let mut x = start;
    for _ in 0..steps {
        x = step(x);
    }
    x.at_root(step)
}

/// The same of two unknowns.
#[inline(always)]
pub fn repeated_for_two<R: Real>(steps: usize, start: (R, R), step: impl Fn(R, R) -> (R, R)) -> (R, R) {
    let (mut a, mut b) = start;
    for _ in 0..steps {
        (a, b) = step(a, b);
    }
    R::at_root_of_two(a, b, step)
}

/// Evaluations at most. Halving an interval of states down to the resolution of an `f64` takes 56, after Newton has been tried; a
/// sweep over all processes prints the most that any took.
pub const ITERATION_CAP: u32 = 80;

/// Newton usually ends in under ten. Where rounding makes a function rough it may wander; from here on only halving.
const NEWTON_STEPS: u32 = 16;

/// Of a temperature in °C: a quarter of a unit in the last place at 273.15 K, below which no state changes.
pub fn temperature_resolution<S: Scalar>() -> S {
    S::epsilon() * k(64.0)
}

/// The root of an increasing function in `[low, high]`, by Newton where its step stays inside what is known to hold the root,
/// by halving elsewhere and after [`NEWTON_STEPS`]. `f` returns value and slope; a NaN value counts as positive (beyond the root).
///
/// Ends when the interval is no wider than the resolution, or the step no longer changes `x`; the value returned is then
/// within a few units in the last place of the root, or of the end of the bracket nearest to it.
pub fn increasing<S: Scalar>(low: S, high: S, resolution: S, f: impl FnMut(S) -> (S, S)) -> S {
    let (x, _evaluations) = search(low, high, resolution, f);
    #[cfg(test)]
    tests::MOST_EVALUATIONS.with(|most| most.set(most.get().max(_evaluations)));
    x
}

/// The same for a function without a derivative: the slope is that of the chord from the last point.
pub fn increasing_by_chords<S: Scalar>(low: S, high: S, resolution: S, mut f: impl FnMut(S) -> S) -> S {
    let (mut last, mut last_value) = (S::nan(), S::nan());
    increasing(low, high, resolution, |x| {
        let value = f(x);
        let slope = (value - last_value) / (x - last);
        (last, last_value) = (x, value);
        (value, slope)
    })
}

/// The root and the evaluations that it took.
fn search<S: Scalar>(low: S, high: S, resolution: S, mut f: impl FnMut(S) -> (S, S)) -> (S, u32) {
    let (mut low, mut high) = (low, high);
    let mut x = high;
    for evaluations in 1..=ITERATION_CAP {
        let (value, slope) = f(x);
        if value == k(0.0) {
            return (x, evaluations);
        }
        if value < k(0.0) {
            low = x;
        } else {
            high = x;
        }
        let newton = x - value / slope;
        let next = if evaluations <= NEWTON_STEPS && low < newton && newton < high {
            newton
        } else {
            low + (high - low) * k(0.5)
        };
        if next == x || high - low <= resolution || !(low < next && next < high) {
            return (x, evaluations);
        }
        x = next;
    }
    (x, ITERATION_CAP)
}

/// The root of a function between an end where it is below zero and one where it is above, from its values alone; both ends are given
/// with their values. A NaN counts as positive.
///
/// Interpolation kept within what halving would reach: Oliveira and Takahashi 2020, "An enhancement of the bisection method average
/// performance preserving minmax optimality", ACM Trans. Math. Softw. 47(1), 5, with κ₁ = 0.2 / (b − a), κ₂ = 2, n₀ = 6: six
/// evaluations more than halving at most.
pub fn between<S: Scalar>(low: (S, S), high: (S, S), resolution: S, f: impl FnMut(S) -> S) -> S {
    let (x, _evaluations) = interpolate(low, high, resolution, f);
    #[cfg(test)]
    tests::MOST_EVALUATIONS.with(|most| most.set(most.get().max(_evaluations)));
    x
}

/// The root and the evaluations that it took.
fn interpolate<S: Scalar>(low: (S, S), high: (S, S), resolution: S, mut f: impl FnMut(S) -> S) -> (S, u32) {
    let ((mut a, mut below), (mut b, mut above)) = (low, high);
    let half = k::<S>(0.5);
    let shift = k::<S>(0.2) / (b - a);
    // What halving would have left to search before this step, times 2^(n₀ − 1).
    let mut reach = resolution;
    for _ in 0..ITERATION_CAP {
        if reach >= b - a {
            break;
        }
        reach = reach + reach;
    }
    reach = reach * k(32.0);
    for evaluations in 0..ITERATION_CAP {
        let width = b - a;
        let middle = a + width * half;
        if width <= resolution || !(a < middle && middle < b) {
            return (middle, evaluations);
        }
        let regula_falsi = (above * a - below * b) / (above - below);
        let toward = if regula_falsi < middle { k::<S>(1.0) } else { k(-1.0) };
        let away = (middle - regula_falsi) * toward;
        let truncated = away - (shift * width * width).at_most(away);
        // A quotient without a value leaves the middle.
        let allowed = (reach - width * half).at_least(k(0.0));
        let off = if truncated <= allowed { truncated } else { allowed };
        let x = if truncated >= k(0.0) { middle - toward * off } else { middle };
        let x = if a < x && x < b { x } else { middle };
        let value = f(x);
        if value == k(0.0) {
            return (x, evaluations + 1);
        }
        if value < k(0.0) {
            (a, below) = (x, value);
        } else {
            (b, above) = (x, value);
        }
        reach = reach * half;
    }
    (a + (b - a) * half, ITERATION_CAP)
}

#[cfg(test)]
pub(crate) mod tests {
    use super::*;
    use crate::real::power;
    use core::cell::Cell;

    std::thread_local! {
        /// The most evaluations of one search on this thread.
        pub(crate) static MOST_EVALUATIONS: Cell<u32> = const { Cell::new(0) };
    }

    /// Hostile shapes: flat then steep, NaN to the right, no slope, roots at and beyond the ends, a root at zero.
    #[test]
    fn finds_roots_of_hostile_shapes() {
        let root = |low, high, f: fn(f64) -> (f64, f64)| increasing(low, high, 0.0, f);
        assert!((root(-1.0, 2.0, |x| (x * x * x - 1e-3, 3.0 * x * x)) - 0.1).abs() < 1e-15);
        let beyond = root(0.0, 10.0, |x| if x > 3.0 { (f64::NAN, f64::NAN) } else { (x - 2.5, 1.0) });
        assert!((beyond - 2.5).abs() < 1e-15, "{beyond}");
        assert!((root(0.0, 1.0, |x| (x - 0.3, 0.0)) - 0.3).abs() < 1e-15);
        assert!(root(0.0, 1.0, |x| (x + 1.0, 1.0)) < 1e-15);
        assert!((root(0.0, 1.0, |x| (x - 7.0, 1.0)) - 1.0).abs() < 1e-15);
    }

    /// Chords find what Newton finds, in a few steps more.
    #[test]
    fn finds_roots_by_chords() {
        MOST_EVALUATIONS.set(0);
        let cubic = increasing_by_chords(-1.0, 2.0, 0.0, |x: f64| x * x * x - 1e-3);
        assert!((cubic - 0.1).abs() < 1e-15, "{cubic}");
        let pole = increasing_by_chords(0.0, 1.0, 0.0, |x: f64| 1.0 / (1.1 - x) - 4.0);
        assert!((pole - 0.85).abs() < 1e-15, "{pole}");
        assert!(MOST_EVALUATIONS.get() < 20, "{}", MOST_EVALUATIONS.get());
    }

    /// From values alone: smooth in a few evaluations, hostile in no more than halving takes and six.
    #[test]
    fn interpolates() {
        let cubic = |x: f64| x * x * x - 1e-3;
        let (x, evaluations) = interpolate((-1.0, cubic(-1.0)), (2.0, cubic(2.0)), 1e-12, cubic);
        assert!((x - 0.1).abs() < 1e-11 && evaluations <= 30, "{x} {evaluations}");
        let flat = |x: f64| power(x - 0.3, 9);
        let (x, evaluations) = interpolate((0.0, flat(0.0)), (1.0, flat(1.0)), 1e-12, flat);
        assert!((x - 0.3).abs() < 1e-11 && evaluations <= 46, "{x} {evaluations}");
        let step = |x: f64| if x < 0.7 { -1e-9 } else { f64::NAN };
        let (x, evaluations) = interpolate((0.0, -1.0), (1.0, 1.0), 1e-12, step);
        assert!((x - 0.7).abs() < 1e-11 && evaluations <= 46, "{x} {evaluations}");
        assert_eq!(interpolate((1.0, -1.0), (1.0, 1.0), 1e-12, step), (1.0, 0));
    }

    /// A step at zero, where relative halving would go on to the subnormals.
    #[test]
    fn ends_at_the_resolution() {
        let step = |x: f64| (if x < 0.0 { -1.0 } else { 1.0 }, 0.0);
        let (at_zero, evaluations) = search(-100.0, 173.0, temperature_resolution(), step);
        assert!(at_zero.abs() < 1e-13 && evaluations == 56, "{at_zero} {evaluations}");
        assert_eq!(search(-100.0, 173.0, 0.0, step).1, ITERATION_CAP);
    }
}
