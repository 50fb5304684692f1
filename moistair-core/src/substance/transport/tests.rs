//! The transport of the pure gases against the tables of their publications.
#![allow(clippy::disallowed_methods, reason = "an independent evaluation uses the platform's functions")]

use core::f64::consts::PI;
use std::println;

use super::*;
use crate::checks::{Table, Tally};
use crate::substance::dry_air::{self as air, MOLAR_MASS, REDUCING_DENSITY, REDUCING_TEMPERATURE};
use crate::substance::water_vapor as steam;
use crate::substance::{DensityDerivatives, Fluid, Jet, TemperatureOrder, Term, Terms, water};

const AIR: &str = include_str!("../../../../tests/published/lemmon_jacobsen2004_air_transport.csv");
const WATER: &str = include_str!("../../../../tests/published/r12_08_r15_11_water_transport.csv");

/// A fluid as published, for what its critical enhancement needs.
struct Equation {
    gas_constant: f64,
    reducing_density: f64,
    at: fn(f64, f64) -> Derivatives,
}

/// Density derivatives of φʳ, τφʳ_τ and τ²φʳ_ττ, and τ²φ°_ττ.
struct Derivatives {
    value: DensityDerivatives<f64>,
    first: DensityDerivatives<f64>,
    second: DensityDerivatives<f64>,
    ideal: f64,
}

impl Derivatives {
    fn of<const L: usize>(ideal: Jet<f64>, terms: &'static [Term; L], tau: f64, delta: f64) -> Self {
        let terms = Terms::at(ideal, terms, tau);
        let part = |of| terms.residual(delta, of);
        let [value, first, second] =
            [TemperatureOrder::Value, TemperatureOrder::First, TemperatureOrder::Second].map(part);
        Self { value, first, second, ideal: ideal.second }
    }
}

const DRY_AIR: Equation = Equation {
    gas_constant: air::GAS_CONSTANT,
    reducing_density: REDUCING_DENSITY,
    at: |kelvins, delta| Derivatives::of(air::ideal(kelvins), &air::TERMS, REDUCING_TEMPERATURE / kelvins, delta),
};

const WATER_VAPOR: Equation = Equation {
    gas_constant: water::GAS_CONSTANT,
    reducing_density: water::CRITICAL_DENSITY,
    at: |kelvins, delta| {
        Derivatives::of(steam::ideal(kelvins), &water::TERMS, water::CRITICAL_TEMPERATURE / kelvins, delta)
    },
};

impl Equation {
    /// (∂p/∂ρ)_T, J/kg.
    fn stiffness(&self, kelvins: f64, density: f64) -> f64 {
        let part = (self.at)(kelvins, density / self.reducing_density).value;
        self.gas_constant * kelvins * (1.0 + 2.0 * part.first + part.second)
    }

    /// c_v and c_p, J/(kg K).
    fn heat_capacities(&self, kelvins: f64, density: f64) -> (f64, f64) {
        let of = (self.at)(kelvins, density / self.reducing_density);
        let cv = -self.gas_constant * (of.ideal + of.second.value);
        let tension = 1.0 + of.value.first - of.first.first;
        (cv, cv + self.gas_constant * tension * tension / (1.0 + 2.0 * of.value.first + of.value.second))
    }
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
    let susceptibility = |kelvins| {
        CRITICAL_PRESSURE * density / (REDUCING_DENSITY * REDUCING_DENSITY * DRY_AIR.stiffness(kelvins, density))
    };
    let excess = susceptibility(kelvins) - susceptibility(REFERENCE) * REFERENCE / kelvins;
    if excess <= 0.0 {
        return 0.0;
    }
    let correlation_length = 0.11e-9 * (excess / 0.055).powf(0.63 / 1.2415);
    let y = correlation_length / 0.31e-9;
    let (cv, cp) = DRY_AIR.heat_capacities(kelvins, density);
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

/// The critical enhancement of the conductivity of water over its background: R15-11 Eqs. (18) to (24), constants of Table 3 from memory.
fn share_of_water(kelvins: f64, density: f64) -> f64 {
    const REFERENCE: f64 = 1.5 * water::CRITICAL_TEMPERATURE;
    let (reduced, delta) = (kelvins / water::CRITICAL_TEMPERATURE, density / water::CRITICAL_DENSITY);
    let susceptibility = |kelvins| 22.064e6 / water::CRITICAL_DENSITY / WATER_VAPOR.stiffness(kelvins, density);
    let excess = delta * (susceptibility(kelvins) - susceptibility(REFERENCE) * REFERENCE / kelvins);
    let y = 0.13 / 0.40 * (excess.max(0.0) / 0.06).powf(0.630 / 1.239);
    let (cv, cp) = WATER_VAPOR.heat_capacities(kelvins, density);
    let inner =
        (1.0 - cv / cp) * y.atan() + cv / cp * y - 1.0 + (-1.0 / (1.0 / y + y * y / (3.0 * delta * delta))).exp();
    let background = water_vapor::transport(kelvins, density);
    let enhancement =
        177.8514 * delta * cp / water::GAS_CONSTANT * reduced / (background.viscosity * 1e6) * 2.0 / (PI * y) * inner;
    enhancement * 1e-3 / background.conductivity
}

/// What `water_vapor.rs` says of the enhancement that it leaves out: saturated steam, and that of IAPWS-95 to 1 % (3.670858e-4 at 150 °C,
/// computed with the general-purpose iapws package).
#[test]
fn critical_enhancement_of_vapor_is_as_small_as_said() {
    let saturated = [(20.0, 0.0173140), (60.0, 0.130424), (100.0, 0.598170), (120.0, 1.12207), (150.0, 2.54808)];
    let shares = saturated.map(|(celsius, density)| share_of_water(celsius + 273.15, density));
    println!("critical enhancement of saturated steam, 20 to 150 °C: {shares:?}");
    assert!((shares[4] / 3.670858e-4 - 1.0).abs() < 0.01 && shares.iter().all(|share| (0.0..4e-4).contains(share)));
}
