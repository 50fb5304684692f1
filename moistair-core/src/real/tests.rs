//! Accuracy, edges, and sameness of the elementary functions.

use std::collections::BTreeMap;
use std::println;

use super::*;

type Function<T> = fn(T) -> T;

const REFERENCE: &str = include_str!("elementary_reference.csv");

/// Largest error in units in the last place that the documentation states, and the rows of the table that it is held to.
const BOUNDS: [(&str, Function<f64>, f64, usize); 3] =
    [("exp", Real::exp, 1.0, 190), ("ln", Real::ln, 0.9, 250), ("atan", Real::atan, 1.5, 190)];
/// The same for `f32`.
const SINGLE_BOUNDS: [(&str, Function<f32>, Function<f64>, f64); 3] =
    [("exp", Real::exp, Real::exp, 1.01), ("ln", Real::ln, Real::ln, 0.85), ("atan", Real::atan, Real::atan, 1.40)];

/// SplitMix64 (Steele, Lea and Flood 2014, "Fast splittable pseudorandom number generators", fig. 17).
struct Random(u64);

impl Random {
    fn bits(&mut self) -> u64 {
        self.0 = self.0.wrapping_add(0x9e3779b97f4a7c15);
        let z = (self.0 ^ (self.0 >> 30)).wrapping_mul(0xbf58476d1ce4e5b9);
        let z = (z ^ (z >> 27)).wrapping_mul(0x94d049bb133111eb);
        z ^ (z >> 31)
    }

    fn between(&mut self, low: f64, high: f64) -> f64 {
        low + (high - low) * ((self.bits() >> 11) as f64 / (1_u64 << 53) as f64)
    }

    /// Every fourth any bits at all, NaN, infinities and subnormals among them; the others of everyday size.
    fn argument(&mut self) -> f64 {
        match self.bits() % 4 {
            0 => f64::from_bits(self.bits()),
            1 => self.between(-40.0, 40.0),
            2 => self.between(0.0, 2.0),
            _ => self.between(-800.0, 800.0),
        }
    }
}

/// The unit in the last place of a number of this size.
fn unit(size: f64, digits: i64, lowest_exponent: i64) -> f64 {
    let exponent = ((size.abs().to_bits() >> 52) as i64 - 1023).max(lowest_exponent) - (digits - 1);
    if exponent >= -1022 {
        f64::from_bits(((exponent + 1023) as u64) << 52)
    } else {
        f64::from_bits(1 << (exponent + 1074))
    }
}

fn same<T: Scalar>(a: T, b: T) -> bool {
    (a.is_nan() && b.is_nan()) || a.integer_decode() == b.integer_decode()
}

fn from_hex(field: Option<&str>) -> f64 {
    f64::from_bits(u64::from_str_radix(field.unwrap(), 16).unwrap())
}

/// The rows of the reference table for one function: range, argument, value in two parts.
fn reference_rows(function: &str) -> impl Iterator<Item = (&'static str, f64, f64, f64)> {
    REFERENCE.lines().filter_map(move |line| {
        let mut fields = line.strip_prefix(function)?.strip_prefix(',')?.split(',');
        Some((fields.next()?, from_hex(fields.next()), from_hex(fields.next()), from_hex(fields.next())))
    })
}

#[test]
fn reference_values_in_double_precision() {
    for (name, function, bound, rows) in BOUNDS {
        let (mut compared, mut ranges) = (0, BTreeMap::new());
        for (range, x, value, rest) in reference_rows(name) {
            let error = ((function(x) - value) - rest).abs() / unit(value, 53, -1022);
            assert!(error <= bound, "{name}({x:e}): {error} units in the last place");
            let worst = ranges.entry(range).or_insert(0.0_f64);
            *worst = worst.max(error);
            compared += 1;
        }
        println!("{name:5} f64 {ranges:.4?} of {bound} units in the last place, {compared} values");
        assert!(compared >= rows, "{name}: {compared} values compared");
        assert!(ranges.into_values().any(|worst| worst >= bound / 2.0), "{name}: stale bound {bound}");
    }
}

/// Every `step`-th of all bit patterns of `f32`, against the double-precision function.
fn sweep_single_precision(step: usize) {
    for (name, single, double, bound) in SINGLE_BOUNDS {
        let (mut worst, mut at) = (0.0, 0.0);
        for bits in (0..=u32::MAX).step_by(step) {
            let x = f32::from_bits(bits);
            let (value, exact) = (single(x), double(x.into()));
            let rounded = exact as f32;
            let flushed = name == "exp" && rounded < f32::MIN_POSITIVE;
            if rounded.is_nan() || rounded.is_infinite() || rounded == 0.0 || flushed {
                let expected = if flushed { 0.0 } else { rounded };
                assert!(same(value, expected), "{name}({x:e}) = {value:e}, not {expected:e}");
                continue;
            }
            let error = (f64::from(value) - exact).abs() / unit(exact, 24, -126);
            assert!(error <= bound, "{name}({x:e}): {error} units in the last place");
            if error > worst {
                (worst, at) = (error, x);
            }
        }
        println!("{name:5} f32 {worst:.4} of {bound} units in the last place, at {at:e}");
        assert!(worst >= bound / 2.0, "{name}: stale bound {bound}, largest error {worst}");
    }
}

#[test]
fn single_precision_against_double() {
    sweep_single_precision(1021);
}

#[test]
#[ignore = "all 2³² arguments of three functions: minutes"]
fn single_precision_against_double_exhaustive() {
    sweep_single_precision(1);
}

macro_rules! special_values {
    ($test:ident, $float:ident, $pi_half:expr) => {
        #[test]
        fn $test() {
            let (infinity, nan, pi_half) = ($float::INFINITY, $float::NAN, $pi_half);
            let (tiny, smallest, largest) = ($float::from_bits(1), $float::MIN_POSITIVE, $float::MAX);
            let table: [(&str, Function<$float>, &[($float, $float)]); 4] = [
                (
                    "exp",
                    Real::exp,
                    &[
                        (nan, nan),
                        (infinity, infinity),
                        (-infinity, 0.0),
                        (0.0, 1.0),
                        (-0.0, 1.0),
                        (tiny, 1.0),
                        (-tiny, 1.0),
                        (largest, infinity),
                        (-largest, 0.0),
                        (coefficients_of::$float::EXP_LARGEST.next_up(), infinity),
                        (coefficients_of::$float::EXP_SMALLEST.next_down(), 0.0),
                    ],
                ),
                (
                    "ln",
                    Real::ln,
                    &[
                        (nan, nan),
                        (infinity, infinity),
                        (-infinity, nan),
                        (0.0, -infinity),
                        (-0.0, -infinity),
                        (1.0, 0.0),
                        (-1.0, nan),
                        (-tiny, nan),
                        (-largest, nan),
                    ],
                ),
                (
                    "atan",
                    Real::atan,
                    &[
                        (nan, nan),
                        (infinity, pi_half),
                        (-infinity, -pi_half),
                        (0.0, 0.0),
                        (-0.0, -0.0),
                        (tiny, tiny),
                        (-smallest, -smallest),
                        (1.0, pi_half / 2.0),
                        (largest, pi_half),
                    ],
                ),
                ("sqrt", Real::sqrt, &[(-0.0, -0.0), (-1.0, nan), (infinity, infinity), (nan, nan), (2.25, 1.5)]),
            ];
            for (name, function, rows) in table {
                for &(x, expected) in rows {
                    assert!(same(function(x), expected), "{name}({x:e}) = {:e}, not {expected:e}", function(x));
                }
            }
            // The last arguments on this side of overflow and of underflow.
            let (high, low) = (coefficients_of::$float::EXP_LARGEST, coefficients_of::$float::EXP_SMALLEST);
            assert!(Real::exp(high) > largest * 0.99 && Real::exp(high) <= largest);
            assert!(Real::exp(low) >= smallest && Real::exp(low) < smallest * 1.01);
        }
    };
}

mod coefficients_of {
    pub use crate::real::coefficients::{double as f64, single as f32};
}
special_values!(special_values_in_double_precision, f64, core::f64::consts::FRAC_PI_2);
special_values!(special_values_in_single_precision, f32, core::f32::consts::FRAC_PI_2);

/// Everything that the trait offers, once, so that lanes can be compared with scalars.
fn everything<R: Real>(x: R, y: R) -> [R; 14] {
    let chosen = R::select(x.lt(y).and(x.le(k(3.0)).not()).or(y.le(x)), x, y);
    [
        x.exp(),
        x.ln(),
        x.atan(),
        x.sqrt(),
        x + y,
        x - y,
        x * y,
        x / y,
        -x,
        x.at_most(y),
        x.at_least(y),
        chosen,
        polynomial(x, [0.5, -1.25, 3.0, 0.1]),
        power(x, 7),
    ]
}

fn lanes_equal_scalars<T: Scalar, const N: usize>(seed: u64, narrow: fn(f64) -> T) {
    let mut random = Random(seed);
    for _ in 0..65_536 / N {
        let x: [T; N] = core::array::from_fn(|_| narrow(random.argument()));
        let y: [T; N] = core::array::from_fn(|_| narrow(random.argument()));
        let rows = everything(Lanes(x), Lanes(y));
        for i in 0..N {
            for (j, value) in everything(x[i], y[i]).into_iter().enumerate() {
                assert!(same(rows[j].0[i], value), "entry {j} of {:e}, {:e}", x[i].to_f64(), y[i].to_f64());
            }
        }
    }
}

#[test]
fn lanes_have_the_bits_of_scalars() {
    lanes_equal_scalars::<f64, 8>(1, |x| x);
    lanes_equal_scalars::<f64, 32>(2, |x| x);
    lanes_equal_scalars::<f32, 8>(3, |x| x as f32);
    lanes_equal_scalars::<f32, 32>(4, |x| x as f32);
}

/// The sum over a seeded grid is a constant of the source text: any optimisation and any processor must arrive at it.
#[test]
fn bits_are_the_same_everywhere() {
    let mut random = Random(2024);
    let mut digest = 0xcbf29ce484222325_u64;
    for _ in 0..50_000 {
        let x = random.argument();
        let single = x as f32;
        for bits in [Real::exp(x), Real::ln(x), Real::atan(x), Real::sqrt(x)]
            .map(|value| if value.is_nan() { 0 } else { value.to_bits() })
            .into_iter()
            .chain(
                [Real::exp(single), Real::ln(single), Real::atan(single), Real::sqrt(single)]
                    .map(|value| if value.is_nan() { 0 } else { value.to_bits().into() }),
            )
        {
            // FNV-1a over 64-bit words.
            digest = (digest ^ bits).wrapping_mul(0x100000001b3);
        }
    }
    assert_eq!(digest, 0x1c5d1ea932e2f4e5, "{digest:#018x}");
}

/// Among random arguments and on both sides of every seam between two reductions.
#[test]
fn neighboring_arguments_do_not_fall() {
    let ln_2 = core::f64::consts::LN_2;
    let exp_seams = (-1021..1024).map(|n| (f64::from(n) + 0.5) * ln_2);
    let ln_seams = (-200..200).map(|n| core::f64::consts::FRAC_1_SQRT_2 * unit(1.0, 1 - n, -1022));
    rises("exp", Real::exp, -700.0, 700.0, exp_seams);
    rises("ln", Real::ln, 0.5, 3.0, ln_seams);
    rises("atan", Real::atan, -4.0, 4.0, [-2.0, -0.5, 0.5, 2.0].into_iter());
}

fn rises(name: &str, function: Function<f64>, low: f64, high: f64, seams: impl Iterator<Item = f64>) {
    let mut random = Random(5);
    let around = seams
        .map(|seam| (0..100).fold(seam, |x, _| x.next_down()))
        .chain((0..2_000).map(|_| random.between(low, high)));
    for start in around {
        let mut x = start;
        for _ in 0..200 {
            let next = x.next_up();
            assert!(function(x) <= function(next), "{name} falls at {x:e}");
            x = next;
        }
    }
}

#[test]
fn exponential_and_logarithm_are_inverse() {
    let mut random = Random(6);
    for _ in 0..100_000 {
        let x = random.between(-700.0, 700.0);
        let back = Real::ln(Real::exp(x));
        // One unit of exp is ε relative, hence ε absolute in ln; then one unit of ln.
        assert!((back - x).abs() <= f64::EPSILON * (1.0 + x.abs()), "ln exp {x:e} = {back:e}");
        let y = random.between(1e-3, 1e7);
        let back = Real::exp(Real::ln(y));
        // One unit of ln y is at most 2^-49 here.
        assert!((back - y).abs() <= y * f64::EPSILON * (1.0 + 16.2), "exp ln {y:e} = {back:e}");
    }
}

#[test]
fn polynomial_and_power() {
    assert!(same(polynomial(2.0, []), 0.0_f64));
    assert!(same(polynomial(f64::INFINITY, [3.0]), 3.0));
    assert!(same(polynomial(2.0, [1.0, 2.0, 3.0]), 17.0_f64));
    for (exponent, expected) in [(0, 1.0), (1, -3.0), (2, 9.0), (5, -243.0), (8, 6561.0_f64)] {
        assert!(same(power(-3.0, exponent), expected));
    }
}
