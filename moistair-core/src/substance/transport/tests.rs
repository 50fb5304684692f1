//! The transport of the pure gases against the tables of their publications.
#![allow(clippy::disallowed_methods, reason = "an independent evaluation uses the platform's functions")]

use core::f64::consts::PI;
use std::println;

use super::*;
use crate::checks::{Table, Tally};
use crate::substance::dry_air::{self as air, MOLAR_MASS, REDUCING_DENSITY, REDUCING_TEMPERATURE};
use crate::substance::{DensityDerivatives, Fluid, TemperatureOrder, Terms};

const AIR: &str = include_str!("../../../../tests/published/lemmon_jacobsen2004_air_transport.csv");
const WATER: &str = include_str!("../../../../tests/published/r12_08_r15_11_water_transport.csv");

fn residual(kelvins: f64, density: f64, of: TemperatureOrder) -> DensityDerivatives<f64> {
    Terms::at(air::ideal(kelvins), &air::TERMS, REDUCING_TEMPERATURE / kelvins).residual(density / REDUCING_DENSITY, of)
}

/// (∂p/∂ρ)_T of dry air, J/kg.
fn stiffness(kelvins: f64, density: f64) -> f64 {
    let part = residual(kelvins, density, TemperatureOrder::Value);
    air::GAS_CONSTANT * kelvins * (1.0 + 2.0 * part.first + part.second)
}

/// c_v and c_p of dry air, J/(kg K).
fn heat_capacities(kelvins: f64, density: f64) -> (f64, f64) {
    let value = residual(kelvins, density, TemperatureOrder::Value);
    let first = residual(kelvins, density, TemperatureOrder::First);
    let second = residual(kelvins, density, TemperatureOrder::Second);
    let cv = -air::GAS_CONSTANT * (air::ideal(kelvins).second + second.value);
    let tension = 1.0 + value.first - first.first;
    (cv, cv + air::GAS_CONSTANT * tension * tension / (1.0 + 2.0 * value.first + value.second))
}

/// The critical enhancement of the conductivity, W/(m K): Lemmon & Jacobsen 2004 Eqs. (7) to (11). Their table takes 3.78502 MPa, the
/// maxcondentherm, for the critical pressure.
fn critical_enhancement(kelvins: f64, density: f64) -> f64 {
    const CRITICAL_PRESSURE: f64 = 3.78502e6;
    const REFERENCE: f64 = 265.262;
    const BOLTZMANN: f64 = 1.380658e-23;
    if density == 0.0 {
        return 0.0;
    }
    let susceptibility =
        |kelvins| CRITICAL_PRESSURE * density / (REDUCING_DENSITY * REDUCING_DENSITY * stiffness(kelvins, density));
    let excess = susceptibility(kelvins) - susceptibility(REFERENCE) * REFERENCE / kelvins;
    if excess <= 0.0 {
        return 0.0;
    }
    let correlation_length = 0.11e-9 * (excess / 0.055).powf(0.63 / 1.2415);
    let y = correlation_length / 0.31e-9;
    let (cv, cp) = heat_capacities(kelvins, density);
    let omega = 2.0 / PI * ((cp - cv) / cp * y.atan() + cv / cp * y);
    let dilution = REDUCING_DENSITY / density;
    let background = 2.0 / PI * (1.0 - (-1.0 / (1.0 / y + y * y * dilution * dilution / 3.0)).exp());
    let viscosity = dry_air::transport(kelvins, density).viscosity;
    density * cp * BOLTZMANN * 1.01 * kelvins / (6.0 * PI * correlation_length * viscosity) * (omega - background)
}

/// Lemmon & Jacobsen 2004 Table V, the conductivity with its critical enhancement added.
#[test]
fn dry_air_table() {
    let table = Table::read(AIR);
    let mut tally = Tally::new("Lemmon and Jacobsen 2004 Table V");
    for row in table.rows() {
        let (kelvins, density) = (row.input("T_K"), row.input("rho_mol_dm3") * 1e3 * MOLAR_MASS);
        let computed = dry_air::transport(kelvins, density);
        tally.row(
            row,
            match row.text("quantity") {
                "mu air" => computed.viscosity * 1e6,
                _ => (computed.conductivity + critical_enhancement(kelvins, density)) * 1e3,
            },
        );
    }
    tally.finish(12);
}

/// R12-08 Table 4 and R15-11 Table 4, at vapor and far denser.
#[test]
fn water_tables() {
    let table = Table::read(WATER);
    let mut tally = Tally::new("R12-08 and R15-11 Table 4");
    for row in table.rows() {
        let computed = water_vapor::transport(row.input("T_K"), row.input("rho_kg_m3"));
        tally.row(
            row,
            match row.text("quantity") {
                "mu (mu2=1)" => computed.viscosity * 1e6,
                _ => computed.conductivity * 1e3,
            },
        );
    }
    tally.finish(15);
}

/// What `dry_air.rs` says of the enhancement that it leaves out, over the range of states.
#[test]
fn critical_enhancement_of_dry_air_is_as_small_as_said() {
    let share = |celsius: f64, pressure: f64| {
        let kelvins = celsius + 273.15;
        let density = pressure / (air::GAS_CONSTANT * kelvins) * 1.05; // a little denser than the ideal gas
        critical_enhancement(kelvins, density) / dry_air::transport(kelvins, density).conductivity
    };
    let most = |pressure| (-80..=150).map(|celsius| share(f64::from(celsius), pressure)).fold(0.0, f64::max);
    let (atmospheric, compressed) = (most(101_325.0), most(1.1e6));
    println!("critical enhancement of dry air: {atmospheric:e} at 101 kPa, {compressed:e} at 1.1 MPa");
    assert!((3e-6..5e-6).contains(&atmospheric) && (4e-4..6.5e-4).contains(&compressed));
    assert!((-7..=150).all(|celsius| share(f64::from(celsius), 1.1e6) == 0.0) && share(-8.0, 1.1e6) > 0.0);
}
