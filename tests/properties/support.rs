//! Random states of the declared domain.

use moistair_core::*;
use proptest::prelude::*;

/// How many cases a law is tried on: so many, or `MOISTAIR_CASES`.
pub fn cases(usual: u32) -> ProptestConfig {
    ProptestConfig::with_cases(std::env::var("MOISTAIR_CASES").map_or(usual, |cases| cases.parse().unwrap()))
}

/// Dry bulb, basis, and a share of the most vapor that a state there holds; corners often.
pub fn place() -> impl Strategy<Value = (f64, Basis, f64)> {
    let celsius = prop_oneof![
        6 => -80.0..=150.0,
        3 => -45.0..=5.0,
        1 => prop_oneof![Just(-80.0), Just(-40.0), Just(-39.999), Just(0.0), Just(0.01), Just(100.0), Just(150.0)],
    ];
    let pascals = prop_oneof![
        8 => (20e3_f64.ln()..=1.1e6_f64.ln()).prop_map(f64::exp),
        2 => prop_oneof![Just(20e3), Just(101_325.0), Just(1.1e6)],
    ];
    let share = prop_oneof![
        6 => 0.0..=1.0,
        2 => (-14.0..=0.0_f64).prop_map(|exponent| 10_f64.powf(exponent)),
        1 => prop_oneof![Just(0.0), Just(1.0)],
    ];
    let formulation = prop_oneof![Just(Formulation::RealGas), Just(Formulation::IdealGas)];
    (celsius, pascals, formulation, share).prop_map(|(celsius, pascals, formulation, share)| {
        (celsius, Basis::new(Pressure::from_pascals(pascals.clamp(20e3, 1.1e6)), formulation), share)
    })
}

pub fn from_ratio(celsius: f64, ratio: f64, basis: Basis) -> Result<MoistAir, Error> {
    let ratio = HumidityRatio::from_kilograms_per_kilogram(ratio);
    MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), ratio, basis)
}

/// The most vapor that a state holds, as an error reports it for a ratio of 10 kg/kg.
pub fn greatest_ratio(celsius: f64, basis: Basis) -> f64 {
    match from_ratio(celsius, 10.0, basis) {
        Ok(_) => 10.0,
        Err(error) => error.value_and_limits().unwrap().2,
    }
}

/// A state of the domain.
pub fn state() -> impl Strategy<Value = MoistAir> {
    place()
        .prop_map(|(celsius, basis, share)| from_ratio(celsius, share * greatest_ratio(celsius, basis), basis).unwrap())
}

pub fn ratio(air: &MoistAir) -> f64 {
    air.humidity_ratio().kilograms_per_kilogram()
}
