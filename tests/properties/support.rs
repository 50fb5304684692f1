//! Random states of the declared domain.

use moistair_core::*;
use proptest::prelude::*;

/// How many cases a law is tried on: so many, or `MOISTAIR_CASES`.
pub fn cases(usual: u32) -> ProptestConfig {
    let cases = std::env::var("MOISTAIR_CASES").map_or(usual, |cases| cases.parse().unwrap());
    let rejects = 65_536 + 4 * cases;
    ProptestConfig { cases, max_local_rejects: rejects, max_global_rejects: rejects, ..ProptestConfig::default() }
}

/// Dry bulb, basis, and a share of the most vapor that a state there holds; corners often.
pub fn place() -> impl Strategy<Value = (f64, Basis, f64)> {
    prop::sample::select(Formulation::ALL).prop_flat_map(place_of)
}

/// The same for one formulation.
pub fn place_of(formulation: Formulation) -> impl Strategy<Value = (f64, Basis, f64)> {
    let (coldest, warmest) = formulation.limits(Quantity::DryBulb);
    let celsius = prop_oneof![
        6 => coldest..=warmest,
        3 => -45.0..=5.0,
        1 => prop_oneof![Just(coldest), Just(-40.0), Just(-39.999), Just(0.0), Just(0.01), Just(100.0), Just(warmest)],
    ];
    let (low, high) = formulation.limits(Quantity::Pressure);
    let pascals = prop_oneof![
        8 => (low.ln()..=high.ln()).prop_map(f64::exp),
        2 => prop_oneof![Just(low), Just(101_325.0), Just(high)],
    ];
    let share = prop_oneof![
        6 => 0.0..=1.0,
        2 => (-14.0..=0.0_f64).prop_map(|exponent| 10_f64.powf(exponent)),
        1 => prop_oneof![Just(0.0), Just(1.0)],
    ];
    (celsius, pascals, share).prop_map(move |(celsius, pascals, share)| {
        (celsius, Basis::new(Pressure::from_pascals(pascals.clamp(low, high)), formulation), share)
    })
}

/// The warmest state of a basis, °C.
pub fn warmest(basis: Basis) -> f64 {
    basis.formulation().limits(Quantity::DryBulb).1
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
