//! Gases dissolved in water: Henry's constants of IAPWS G7-04, and what the air in the water takes from its saturation.

use super::saturation::supplementary_release;

/// A, B and C of a gas in water: G7-04 Table 2.
#[derive(Clone, Copy, Debug)]
pub struct Gas(f64, f64, f64);

/// Nitrogen.
pub const NITROGEN: Gas = Gas(-9.67578, 4.72162, 11.70585);
/// Oxygen.
pub const OXYGEN: Gas = Gas(-9.44833, 4.43822, 11.42005);
/// Argon.
pub const ARGON: Gas = Gas(-8.40954, 4.29587, 10.52779);
/// Carbon dioxide.
pub const CARBON_DIOXIDE: Gas = Gas(-8.55445, 4.01195, 9.52345);

/// Dry air of three gases: mole fractions of ASHRAE RP-1485 (Herrmann, Kretzschmar and Gatley 2009), as quoted in the
/// general-purpose chemicals package.
const AIR: [(f64, Gas); 3] = [(0.7812, NITROGEN), (0.2095, OXYGEN), (0.0093, ARGON)];

/// Henry's constant, fugacity over mole fraction in the limit of no gas, Pa: G7-04 Eq. (3).
#[must_use]
pub fn constant(gas: Gas, kelvins: f64) -> f64 {
    let Gas(a, b, c) = gas;
    let reduced = kelvins / 647.096;
    let tau = 1.0 - reduced;
    let exponent = a / reduced + b * tau.powf(0.355) / reduced + c * reduced.powf(-0.41) * tau.exp();
    supplementary_release(kelvins) * exponent.exp()
}

/// Henry's constant of air, Pa: each gas dissolves by its own partial pressure.
#[must_use]
pub fn constant_of_air(kelvins: f64) -> f64 {
    1.0 / AIR.iter().map(|(fraction, gas)| fraction / constant(*gas, kelvins)).sum::<f64>()
}

/// Mole fraction of air in liquid water under moist air of a pressure, saturated with water at a partial pressure: an estimate, with
/// the air taken as an ideal gas and Henry's constant as that without pressure (each about a percent of the estimate at 1.1 MPa).
///
/// By Raoult's law the water's share in the gas falls by as much.
#[must_use]
pub fn dissolved_air(kelvins: f64, pascals: f64, water_pascals: f64) -> f64 {
    (pascals - water_pascals) / constant_of_air(kelvins)
}
