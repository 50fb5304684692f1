//! Makes the coefficients of the fits, and measures them against the functions that they stand for.
//!
//!     MOISTAIR_WRITE_FIT=1 cargo test -p moistair-core --lib real_gas::fit     # writes coefficients.rs anew
//!
//! Each function is interpolated at the Chebyshev nodes of its domain by the least number of coefficients that meets its tolerance at points
//! between the nodes. All arithmetic is + − × ÷ √ on doubles in a fixed order, so that every machine makes the same text.

use core::fmt::Write;
use std::prelude::rust_2024::*;
use std::{format, println, vec};

use super::*;
use crate::mixture::two_component::{Phase, cross_second_virial};
use crate::substance::{density_series, ice, liquid_water};

const COMMITTED: &str = include_str!("coefficients.rs");

/// Where each condensed phase's compression is taken up to, Pa: its mean there is exact.
const GREATEST_PRESSURE: f64 = 1.1e6;

/// Half the range of pressures over which their volume is taken, Pa.
const AROUND: f64 = 80e3;

/// More coefficients than any function needs.
const MOST: usize = 24;

/// A function of temperature [K] in the form of a [`Jet`], with the errors allowed in its parts.
struct Target {
    name: &'static str,
    domain: Domain,
    truth: Box<dyn Fn(f64) -> Jet<f64>>,
    allowed: Box<dyn Fn(f64) -> [f64; 3]>,
}

impl Target {
    fn new(
        name: &'static str,
        domain: Domain,
        truth: impl Fn(f64) -> Jet<f64> + 'static,
        allowed: impl Fn(f64) -> [f64; 3] + 'static,
    ) -> Self {
        Self { name, domain, truth: Box::new(truth), allowed: Box::new(allowed) }
    }
}

/// Errors allowed in p/(ρRT), in h/(RT) and in c/R of one component.
const OF_FLUID: [f64; 3] = [1e-8, 1e-7, 1e-6];

/// The greatest reduced density at a temperature.
fn greatest_density(water: bool, kelvins: f64) -> f64 {
    if water {
        // Saturation over liquid, with room for what the vapor is denser than ideal and for other pressures.
        let celsius = (kelvins - ZERO_CELSIUS).max(COLDEST_LIQUID.coldest);
        1.25 * Real::exp(Phase::of(celsius, liquid_water::at(celsius, REFERENCE_PRESSURE)).potential)
    } else {
        GREATEST_PRESSURE / (dry_air::GAS_CONSTANT * kelvins * dry_air::REDUCING_DENSITY)
    }
}

/// The coefficient of a power of δ.
fn residual(name: &'static str, order: usize, water: bool) -> Target {
    let truth = move |kelvins| {
        if water { smooth_residual_of_water(kelvins)[order - 1] } else { dry_air::residual(kelvins)[order - 1] }
    };
    Target::new(name, GAS, truth, move |kelvins| {
        let share = order as f64 * crate::real::power(greatest_density(water, kelvins), order as u32);
        OF_FLUID.map(|most| most / share)
    })
}

/// The residual of water without the terms of [`STEEP`].
fn smooth_residual_of_water(kelvins: f64) -> [Jet<f64>; water_vapor::ORDERS] {
    const SMOOTH: usize = 42;
    let terms: [Term; SMOOTH] = core::array::from_fn(|i| water::TERMS[i]);
    assert!(terms.iter().all(|term| term.c < 3) && water::TERMS[SMOOTH].c >= 3);
    density_series(&terms, &Term::weights(terms), water::CRITICAL_TEMPERATURE / kelvins)
}

fn fluids() -> Vec<Target> {
    let of_ideal = |_| [1e-7, 2e-8, 3e-7];
    vec![
        Target::new("AIR_IDEAL", GAS, dry_air::ideal, of_ideal),
        residual("AIR_1", 1, false),
        residual("AIR_2", 2, false),
        residual("AIR_3", 3, false),
        residual("AIR_4", 4, false),
        residual("AIR_5", 5, false),
        Target::new("WATER_IDEAL", GAS, water_vapor::ideal, of_ideal),
        residual("WATER_1", 1, true),
        residual("WATER_2", 2, true),
        residual("WATER_3", 3, true),
        residual("WATER_4", 4, true),
        residual("WATER_5", 5, true),
        residual("WATER_6", 6, true),
        // 2 ρ_a B_aw stands beside p/(ρRT) of the vapor.
        Target::new("CROSS_SECOND_VIRIAL", GAS, cross_second_virial, |kelvins| {
            OF_FLUID.map(|most| most * 8.314 * kelvins / (2.0 * GREATEST_PRESSURE))
        }),
    ]
}

type Condensed = fn(f64, f64) -> crate::substance::pure_phase::PurePhase<f64>;

/// The fields of [`Curves`].
fn phase(domain: Domain, phase: Condensed) -> [Target; 4] {
    const WHATEVER: f64 = f64::INFINITY;
    let at = move |kelvins: f64, pressure: f64| phase(kelvins - ZERO_CELSIUS, pressure);
    let potential = move |t: f64| Phase::of(t - ZERO_CELSIUS, at(t, REFERENCE_PRESSURE)).potential;
    let enthalpy = move |t: f64| at(t, REFERENCE_PRESSURE).enthalpy;
    // ∂g/∂p, not the volume itself: below the stability limit of the liquid that one is constant.
    let volume = move |t: f64| {
        let [low, high] =
            [REFERENCE_PRESSURE - AROUND, REFERENCE_PRESSURE + AROUND].map(|pressure| at(t, pressure).gibbs);
        (high - low) / (2.0 * AROUND)
    };
    let compression = move |t: f64| {
        let (low, high) = (at(t, REFERENCE_PRESSURE).gibbs, at(t, GREATEST_PRESSURE).gibbs);
        let rise = GREATEST_PRESSURE - REFERENCE_PRESSURE;
        2.0 * (low + volume(t) * rise - high) / (rise * rise)
    };
    [
        Target::new("potential", domain, differentiated(potential), |_| [3e-9, WHATEVER, WHATEVER]),
        Target::new("enthalpy", domain, differentiated(enthalpy), |_| [2e-2, WHATEVER, WHATEVER]),
        Target::new("volume", domain, differentiated(volume), |_| [1e-9, 5e-8, WHATEVER]),
        Target::new("compression", domain, differentiated(compression), |_| [5e-15, 5e-13, WHATEVER]),
    ]
}

/// A function with τ ∂f/∂τ = −T ∂f/∂T by central difference.
fn differentiated(f: impl Fn(f64) -> f64) -> impl Fn(f64) -> Jet<f64> {
    const STEP: f64 = 0.01;
    move |t| Jet { value: f(t), first: -t * (f(t + STEP) - f(t - STEP)) / (2.0 * STEP), second: 0.0 }
}

/// Name, domain and equation of each phase.
const PHASES: [(&str, Domain, Condensed); 4] = [
    ("ICE", ICE, ice::at),
    ("COLDEST_LIQUID", COLDEST_LIQUID, liquid_water::at),
    ("COLD_LIQUID", COLD_LIQUID, liquid_water::at),
    ("WARM_LIQUID", WARM_LIQUID, liquid_water::at),
];

/// cos(π q) for 0 ≤ q ≤ 1: Taylor's series after halving four times.
fn cos_pi(q: f64) -> f64 {
    let x = core::f64::consts::PI * q / 16.0;
    let (mut sum, mut term) = (0.0, 1.0);
    for n in 0..8 {
        sum += term;
        term *= -x * x / f64::from((2 * n + 1) * (2 * n + 2));
    }
    (0..4).fold(sum, |cosine: f64, _| 2.0 * cosine * cosine - 1.0)
}

impl Domain {
    /// The temperature, K, at a value of the variable.
    fn kelvins(self, x: f64) -> f64 {
        self.middle() * self.stretch() / (x + self.stretch())
    }
}

impl Target {
    /// Monomial coefficients of the interpolation at `count` Chebyshev nodes.
    fn interpolate(&self, count: usize) -> Vec<f64> {
        let angle = |i: usize| (i as f64 + 0.5) / count as f64;
        let values: Vec<f64> = (0..count).map(|i| (self.truth)(self.domain.kelvins(cos_pi(angle(i)))).value).collect();
        // Discrete cosine transform: multiples of the angle folded into [0, 1].
        let cosine = |j: usize, i: usize| {
            let q = j as f64 * angle(i) % 2.0;
            cos_pi(if q > 1.0 { 2.0 - q } else { q })
        };
        let chebyshev = |j: usize| {
            let sum: f64 = values.iter().enumerate().map(|(i, value)| value * cosine(j, i)).sum();
            sum * if j == 0 { 1.0 } else { 2.0 } / count as f64
        };
        // T_{n+1} = 2 x T_n − T_{n−1}, each as its monomials.
        let (mut monomials, mut before, mut this) = (vec![0.0; count], vec![0.0; count + 1], vec![0.0; count + 1]);
        this[0] = 1.0;
        for j in 0..count {
            let weight = chebyshev(j);
            (0..count).for_each(|n| monomials[n] += weight * this[n]);
            let factor = if j == 0 { 1.0 } else { 2.0 };
            let next = (0..=count).map(|n| factor * if n == 0 { 0.0 } else { this[n - 1] } - before[n]).collect();
            before = core::mem::replace(&mut this, next);
            if j == 0 {
                before = vec![0.0; count + 1];
                before[0] = 1.0;
            }
        }
        monomials
    }

    /// Points between the nodes, away from the ends by more than the step of [`differentiated`].
    fn points(&self) -> Vec<Point> {
        let point = |i| {
            let x = -1.0 + (2.0 * f64::from(i) + 1.0) / 200.0;
            let (kelvins, reach) = (self.domain.kelvins(x), x + self.domain.stretch());
            let Jet { value, first, second } = (self.truth)(kelvins);
            Point { x, reach, truth: [value, first, second], allowed: (self.allowed)(kelvins) }
        };
        (0..200).map(point).collect()
    }

    fn fit(&self) -> (Vec<f64>, f64) {
        let points = self.points();
        let fits = (2..=MOST).map(|count| self.interpolate(count)).map(|fit| (worst(&points, &fit), fit));
        let mut least = f64::INFINITY;
        for (worst, fit) in fits {
            least = least.min(worst);
            if worst <= 1.0 {
                return (fit, worst);
            }
        }
        std::panic!("{}: at best {least:e} times what is allowed", self.name)
    }
}

struct Point {
    x: f64,
    reach: f64,
    truth: [f64; 3],
    allowed: [f64; 3],
}

/// The worst error over that allowed.
fn worst(points: &[Point], coefficients: &[f64]) -> f64 {
    points.iter().fold(0.0, |worst, point| {
        let fit = derivatives(coefficients, point.x, point.reach);
        (0..3).fold(worst, |worst: f64, i| worst.max((fit[i] - point.truth[i]).abs() / point.allowed[i]))
    })
}

/// f, τ ∂f/∂τ, τ² ∂²f/∂τ² of a polynomial.
fn derivatives(coefficients: &[f64], x: f64, reach: f64) -> [f64; 3] {
    let (mut value, mut first, mut second) = (0.0, 0.0, 0.0);
    for c in coefficients.iter().rev() {
        second = second * x + 2.0 * first;
        first = first * x + value;
        value = value * x + c;
    }
    [value, first * reach, second * reach * reach]
}

/// The file of coefficients, and how many there are.
fn text() -> (String, usize) {
    let mut text = String::from("//! Made by `fit.rs`; do not edit.\n\nuse super::Curves;\n");
    let mut total = 0;
    let mut array = |target: &Target| {
        let (fit, worst) = target.fit();
        println!("{:20}{:3} coefficients, {worst:.2} of what is allowed", target.name, fit.len());
        total += fit.len();
        (fit.len(), fit.iter().map(|c| format!("    {c:?},\n")).collect::<String>())
    };
    for target in fluids() {
        let (count, lines) = array(&target);
        let _ = write!(text, "\npub const {}: [f64; {count}] = [\n{lines}];\n", target.name);
    }
    for (name, domain, equation) in PHASES {
        println!("{name}");
        let fields = phase(domain, equation).map(|target| (target.name, array(&target)));
        let counts = fields.iter().map(|(_, (count, _))| format!("{count}")).collect::<Vec<_>>().join(", ");
        let _ = write!(text, "\npub const {name}: Curves<{counts}> = Curves {{\n");
        for (field, (_, lines)) in fields {
            let _ = write!(text, "    {field}: [\n{}    ],\n", lines.replace("    ", "        "));
        }
        text.push_str("};\n");
    }
    (text, total)
}

#[test]
fn coefficients_are_those_of_the_fit() {
    let (text, total) = text();
    println!("{total} coefficients");
    let place = concat!(env!("CARGO_MANIFEST_DIR"), "/src/mixture/real_gas/coefficients.rs");
    if std::env::var_os("MOISTAIR_WRITE_FIT").is_some() {
        std::fs::write(place, &text).unwrap();
    } else {
        assert!(text == COMMITTED, "coefficients.rs is not what fit.rs makes");
    }
}

/// One part in 10⁶ of a coefficient. The bits above tell of every one; the tolerances of those that a state would feel, among them
/// the greatest of each function that matters at the density of room air.
#[test]
fn a_disturbed_coefficient_shows() {
    let (mut total, mut felt) = (0, 0);
    let phases = PHASES.into_iter().flat_map(|(_, domain, equation)| phase(domain, equation));
    for target in fluids().into_iter().chain(phases) {
        let (points, (fit, _)) = (target.points(), target.fit());
        let shows = |i: usize| {
            let mut disturbed = fit.clone();
            disturbed[i] *= 1.0 + 1e-6;
            let is_committed = |coefficient: f64| COMMITTED.contains(&format!(" {coefficient:?},"));
            assert!(is_committed(fit[i]) && !is_committed(disturbed[i]));
            worst(&points, &disturbed) > 1.0
        };
        let outside = (0..fit.len()).filter(|&i| shows(i)).count();
        println!("{:20} {outside} of {} are felt", target.name, fit.len());
        let matters = ["IDEAL", "_1", "VIRIAL", "potential", "enthalpy", "volume"];
        assert!(outside > 0 || !matters.iter().any(|name| target.name.ends_with(name)), "{}", target.name);
        (total, felt) = (total + fit.len(), felt + outside);
    }
    println!("{felt} of {total} are felt");
}

/// Where two pieces of the liquid meet: no jump in potential, enthalpy [J/kg] and volume [1] that the limits of the real gas would feel.
#[test]
fn pieces_of_the_liquid_meet() {
    let jumps = |pressures: &[f64]| {
        let mut jumps = [0.0_f64; 3];
        for border in [COLD_LIQUID.coldest, WARM_LIQUID.coldest] {
            for &pascals in pressures {
                let liquid = |celsius| <Fitted as Model<f64>>::liquid(celsius, pascals);
                // The next number below the border.
                let (below, above) = (liquid(f64::from_bits(border.to_bits() + 1)), liquid(border));
                let jump = [
                    below.potential - above.potential,
                    below.enthalpy - above.enthalpy,
                    below.volume / above.volume - 1.0,
                ];
                jumps = core::array::from_fn(|i| jumps[i].max(jump[i].abs()));
            }
        }
        println!("jumps of the liquid up to {pressures:?}: {jumps:?}");
        jumps
    };
    let [potential, enthalpy, volume] = jumps(&[20e3, 40e3, 101_325.0, 120e3]);
    assert!(potential < 1e-8 && enthalpy < 0.05 && volume < 1e-6);
    let [potential, enthalpy, volume] = jumps(&[500e3, 1.1e6]);
    assert!(potential < 1e-8 && enthalpy < 0.5 && volume < 1e-6);
}
