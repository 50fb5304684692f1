//! Checks that need what the crate keeps to itself: how fine an enthalpy is, how much work a search takes.

use super::*;
use crate::basis::Formulation;
use crate::checks::Random;
use crate::mixture::{IdealGas, RealGas};
use std::println;

/// How far, in units of ε T c_p, the enthalpy of a formulation strays from a smooth function of temperature, beyond the 8 ε of its
/// sensible and latent parts: no solve for a temperature can be better.
fn roughness<M: Mixture<f64>>() -> f64 {
    let mut random = Random(1);
    let mut worst = 0.0_f64;
    for _ in 0..3_000 {
        let (celsius, pressure) = (random.between(-80.0, 150.0), random.between(2e4, 1.1e6));
        let limit = greatest_humidity_ratio(&M::at(celsius), celsius, pressure);
        let ratio = limit * random.between(0.0, 1.0);
        let first = M::at(celsius).gas(pressure, ratio);
        let kelvins = celsius + 273.15;
        for step in 1..8 {
            let further = celsius + f64::from(step) * 2.0_f64.powi(-44);
            let exact = first.enthalpy + (further - celsius) * first.specific_heat;
            let stray = M::at(further).gas(pressure, ratio).enthalpy - exact;
            let dry = M::at(further).gas(pressure, 0.0).enthalpy;
            let parts = dry.abs() + (first.enthalpy - dry).abs();
            let beyond = stray.abs() - 8.0 * f64::EPSILON * parts;
            worst = worst.max(beyond / (f64::EPSILON * kelvins * first.specific_heat));
        }
    }
    worst
}

#[test]
fn roughness_of_enthalpy() {
    let (real, ideal) = (roughness::<RealGas<f64>>(), roughness::<IdealGas<f64>>());
    println!("enthalpy is rough by {real:.2} (real gas), {ideal:.2} (ideal gas) units of ε T c_p");
    let (for_real, for_ideal) = (books::resolution(Formulation::RealGas), books::resolution(Formulation::IdealGas));
    assert!(real <= for_real && real > for_real / 2.0, "the allowance is too small, or stale");
    assert!(ideal <= for_ideal);
}
