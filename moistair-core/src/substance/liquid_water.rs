//! Liquid water: IAPWS R6-95(2018) at given temperature and pressure, supercooled and superheated included.

use super::pure_phase::{PurePhase, water_at_pressure};
use crate::quantity::ZERO_CELSIUS;
use crate::real::{Real, k, polynomial};

/// Liquid water is evaluated between these, °C; outside, at the nearer end.
pub const RANGE: (f64, f64) = (-45.0, 205.0);

/// R6-95 has no liquid below about −39.5 °C at atmospheric pressure (its stability limit); from here on down, °C, the
/// liquid is continued with a constant heat capacity.
const STABILITY_LIMIT: f64 = -37.0;
/// Of R6-95 at −37 °C and 101 325 Pa, J/(kg K); a test computes it again.
const HEAT_CAPACITY_AT_LIMIT: f64 = 5_707.6;

/// Newton steps for the density. See the test of this module.
const DENSITY_STEPS: usize = 2;

/// Liquid water at `celsius`, `pascals`.
pub fn at<R: Real>(celsius: R, pascals: R) -> PurePhase<R> {
    at_after::<R, DENSITY_STEPS>(celsius, pascals)
}

fn at_after<R: Real, const STEPS: usize>(celsius: R, pascals: R) -> PurePhase<R> {
    let celsius = celsius.at_least(k(RANGE.0)).at_most(k(RANGE.1));
    let within = celsius.at_least(k(STABILITY_LIMIT));
    colder(equation::<R, STEPS>(within, pascals), within, celsius)
}

/// R6-95 itself.
fn equation<R: Real, const STEPS: usize>(celsius: R, pascals: R) -> PurePhase<R> {
    water_at_pressure::<R, STEPS>(celsius + k(ZERO_CELSIUS), pascals, |_| density_start(celsius, pascals))
}

/// Continues below [`STABILITY_LIMIT`] with a constant heat capacity and volume.
fn colder<R: Real>(at_limit: PurePhase<R>, limit: R, celsius: R) -> PurePhase<R> {
    let difference = celsius - limit;
    let (kelvins, limit) = (celsius + k(ZERO_CELSIUS), limit + k(ZERO_CELSIUS));
    let entropy = (at_limit.enthalpy - at_limit.gibbs) / limit;
    let heat_capacity = k::<R>(HEAT_CAPACITY_AT_LIMIT);
    PurePhase {
        gibbs: at_limit.gibbs - entropy * difference + heat_capacity * (difference - kelvins * (kelvins / limit).ln()),
        enthalpy: at_limit.enthalpy + heat_capacity * difference,
        volume: at_limit.volume,
    }
}

/// δ near 0.1 MPa, within 6e-5, by a polynomial in √(t + 41 °C) that this project fitted to R6-95 itself (the root follows
/// the density into the stability limit); a mean compressibility does for the pressure.
fn density_start<R: Real>(celsius: R, pascals: R) -> R {
    const FIT: [f64; 8] =
        [3.0846269, -0.13559452, -0.2274285, -0.032949177, -0.022421427, 0.0078682654, 0.0040252234, -0.015242695];
    let root = (celsius * k(0.01) + k(0.41)).sqrt();
    polynomial((root - k(0.8842193570679061)) / k(0.6842193570679062), FIT)
        * ((pascals - k(101_325.0)) * k(5e-10) + k(1.0))
}

#[cfg(test)]
mod tests;
