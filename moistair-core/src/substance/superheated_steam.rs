//! Superheated steam: IAPWS R6-95(2018) at given temperature and pressure, 0 to 400 °C and up to 1.6 MPa.

use super::Fluid;
use super::pure_phase::{PurePhase, water_at_pressure};
use crate::quantity::ZERO_CELSIUS;
use crate::real::{Real, k};

use super::water;

/// Newton steps for the density. See the test of this module.
const DENSITY_STEPS: usize = 2;

/// Steam at `celsius`, `pascals`; on the side of the liquid no result has a meaning. The terms that shape the critical region (see
/// `water.rs`) leave less than 1e-9 of its energy here.
pub fn at<R: Real>(celsius: R, pascals: R) -> PurePhase<R> {
    at_after::<R, DENSITY_STEPS>(celsius, pascals)
}

/// Start: the second virial coefficient.
fn at_after<R: Real, const STEPS: usize>(celsius: R, pascals: R) -> PurePhase<R> {
    let kelvins = celsius + k(ZERO_CELSIUS);
    water_at_pressure::<R, STEPS>(kelvins, pascals, |water| {
        let ideal = pascals / (kelvins * k(water::GAS_CONSTANT * water::CRITICAL_DENSITY));
        ideal / (k::<R>(1.0) + ideal * water.second_virial())
    })
}

#[cfg(test)]
mod tests;
