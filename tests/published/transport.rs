//! Transport properties of states: dry air beside another publication, and the figures that textbooks give for moist air.

use moistair_core::*;
use moistair_tests::checks::{Table, Tally};

fn states(celsius: f64, humidity: f64) -> [MoistAir; 2] {
    [Formulation::RealGas, Formulation::IdealGas].map(|formulation| {
        let basis = Basis::new(Pressure::from_kilopascals(101.325), formulation);
        let humidity = RelativeHumidity::from_fraction(humidity);
        MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), humidity, basis).unwrap()
    })
}

/// The US Standard Atmosphere 1976 at sea level (figures from memory) stands on older measurements: Lemmon & Jacobsen 2004 lie 0.4 % above
/// its viscosity and 0.7 % above its conductivity, within the uncertainty that they state, 1 % and 2 %.
#[test]
fn dry_air_beside_the_standard_atmosphere() {
    let table = Table::read(include_str!("standard_atmosphere.csv"));
    let mut tally = Tally::new("transport of the standard atmosphere");
    for row in table.rows().filter(|row| ["mu", "k"].contains(&row.text("quantity"))) {
        for air in states(15.0, 0.0) {
            let (computed, uncertainty) = match row.text("quantity") {
                "mu" => (air.dynamic_viscosity().pascal_seconds(), 0.01),
                _ => (air.thermal_conductivity().watts_per_meter_kelvin(), 0.02),
            };
            tally.row_within(row, computed, uncertainty * row.value());
        }
    }
    tally.finish(4);
}

/// Prandtl number 0.7 and Lewis number 0.85 of moist air in rooms: textbook figures, common practice, no source.
#[test]
fn numbers_of_room_air() {
    for celsius in [10.0, 20.0, 30.0] {
        for humidity in [0.0, 0.5, 1.0] {
            for air in states(celsius, humidity) {
                let (prandtl, schmidt, lewis) = (air.prandtl_number(), air.schmidt_number(), air.lewis_number());
                assert!((prandtl - 0.71).abs() < 0.02, "Pr {prandtl} at {celsius} °C, {humidity}");
                assert!((lewis - 0.85).abs() < 0.03, "Le {lewis} at {celsius} °C, {humidity}");
                assert!((schmidt / prandtl / lewis - 1.0).abs() < 1e-14);
                let by_hand = air.thermal_conductivity().watts_per_meter_kelvin()
                    * air.specific_volume().cubic_meters_per_kilogram()
                    / air.specific_heat().joules_per_kilogram_kelvin()
                    / air.vapor_diffusivity().square_meters_per_second();
                assert!((lewis / by_hand - 1.0).abs() < 1e-14);
            }
        }
    }
}

/// Vapor is less viscous than air at the same temperature, so moist air is. The formulations differ only by the densities of the
/// components, which move the viscosity of a gas little.
#[test]
fn moisture_thins_the_air() {
    for celsius in [0.0, 20.0, 50.0, 90.0] {
        let [dry, moist] = [0.0, 0.9].map(|humidity| {
            let [real, ideal] = states(celsius, humidity);
            let ideal = MoistAir::from_dry_bulb(real.dry_bulb(), real.water_mole_fraction(), ideal.basis()).unwrap();
            let [real, ideal] = [real, ideal].map(|air| air.dynamic_viscosity().pascal_seconds());
            assert!((real / ideal - 1.0).abs() < 1e-4, "{real} {ideal}");
            real
        });
        assert!(moist < dry, "{moist} {dry} at {celsius} °C");
    }
}
