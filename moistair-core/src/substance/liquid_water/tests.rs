//! Start, steps and continuation of the liquid.

use std::println;

use super::*;
use crate::substance::water;

const PRESSURES: [f64; 5] = [20e3, 101_325.0, 300e3, 700e3, 1.1e6];

/// What a few Newton steps leave, over the whole range, against many: δ relative at 101 325 Pa, g/RT, h in J/kg.
fn left_over<const STEPS: usize>() -> (f64, f64, f64) {
    let (mut density, mut potential, mut enthalpy) = (0.0_f64, 0.0_f64, 0.0_f64);
    for i in 0..=968 {
        let celsius = STABILITY_LIMIT + 0.25 * f64::from(i);
        for pascals in PRESSURES {
            let (few, many) = (equation::<f64, STEPS>(celsius, pascals), equation::<f64, 12>(celsius, pascals));
            if (pascals - 101_325.0).abs() < 1.0 {
                density = density.max((many.volume / few.volume - 1.0).abs());
            }
            let rt = water::GAS_CONSTANT * (celsius + ZERO_CELSIUS);
            potential = potential.max((few.gibbs - many.gibbs).abs() / rt);
            enthalpy = enthalpy.max((few.enthalpy - many.enthalpy).abs());
        }
    }
    println!("{STEPS} steps: density {density:e}, g/RT {potential:e}, h {enthalpy:e} J/kg");
    (density, potential, enthalpy)
}

/// g/RT enters the logarithm of the saturation humidity ratio as it stands; enthalpy is read to 0.1 J/kg at best.
#[test]
fn density_steps_are_enough_and_none_is_idle() {
    let enough = |(_, potential, enthalpy): (f64, f64, f64)| potential < 1e-11 && enthalpy < 1e-3;
    assert!(enough(left_over::<DENSITY_STEPS>()));
    assert!(!enough(left_over::<{ DENSITY_STEPS - 1 }>()), "one step fewer does as well: the constant is stale");
}

#[test]
fn density_start_is_as_good_as_it_says() {
    let (density, ..) = left_over::<0>();
    assert!(density < 6e-5 && density > 3e-5, "{density:e}: the claim at `density_start` is wrong or stale");
}

#[test]
fn heat_capacity_at_the_stability_limit() {
    let enthalpy = |celsius| equation::<f64, 12>(celsius, 101_325.0).enthalpy;
    let step = 0.01;
    let central = (enthalpy(STABILITY_LIMIT + step) - enthalpy(STABILITY_LIMIT - step)) / (2.0 * step);
    println!("c_p at {STABILITY_LIMIT} °C: {central}");
    assert!((central - HEAT_CAPACITY_AT_LIMIT).abs() < 0.05, "{central}");
}

/// Gibbs energy and enthalpy pass the joint without a step, and below it belong together: ∂(g/T)/∂T = −h/T².
#[test]
fn continuation_below_the_stability_limit() {
    for pascals in PRESSURES {
        let at = |celsius| at::<f64>(celsius, pascals);
        let (below, above) = (at(STABILITY_LIMIT - 1e-7), at(STABILITY_LIMIT + 1e-7));
        let slope = (above.gibbs - below.gibbs) / 2e-7;
        let entropy = (above.enthalpy - above.gibbs) / (STABILITY_LIMIT + ZERO_CELSIUS);
        assert!((slope + entropy).abs() < 1e-3 * entropy.abs(), "{slope} {entropy}");
        assert!((above.enthalpy - below.enthalpy).abs() < 2e-7 * 6_000.0);
        for celsius in [-44.0, -42.0, -40.0, -38.0, -37.5, -36.0, -20.0, 0.0, 20.0, 150.0, 200.0] {
            let (kelvins, step) = (celsius + ZERO_CELSIUS, 1e-3);
            let reduced = |celsius: f64| at(celsius).gibbs / (celsius + ZERO_CELSIUS);
            let slope = (reduced(celsius + step) - reduced(celsius - step)) / (2.0 * step);
            let enthalpy = -slope * kelvins * kelvins;
            assert!(
                (enthalpy - at(celsius).enthalpy).abs() < 0.05,
                "{celsius} °C: {enthalpy} {}",
                at(celsius).enthalpy
            );
        }
    }
}

/// Outside the range the nearer end stands, so that a lane beyond it stays finite.
#[test]
fn clamped_outside_the_range() {
    for (outside, end) in [(-300.0, RANGE.0), (-1e9, RANGE.0), (900.0, RANGE.1), (f64::INFINITY, RANGE.1)] {
        assert_eq!(at::<f64>(outside, 1e5).gibbs.to_bits(), at::<f64>(end, 1e5).gibbs.to_bits());
        assert!(at::<f64>(outside, 1e5).gibbs.is_finite());
    }
}
