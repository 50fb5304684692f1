//! The standard atmosphere below 11 km: ISO 2533:1975 (geopotential altitude), US Standard Atmosphere 1976 (geometric altitude).

use moistair_core::{Length, Pressure};
use moistair_tests::checks::{Table, Tally};

/// The figures are from memory. ISO 2533's gas constant (287.05287) and the molar mass of US 1976 (28.9644) differ by 7e-7, which
/// is 1.1e-6 of the pressure at 11 km; the rest is print.
#[test]
fn standard_atmosphere() {
    let table = Table::read(include_str!("standard_atmosphere.csv"));
    let mut tally = Tally::new("standard atmosphere");
    for row in table.rows().filter(|row| row.text("quantity") == "p") {
        let pressure = if row.text("id").starts_with("US76") {
            Pressure::at_geometric_elevation(Length::from_meters(row.input("Z_m")))
        } else {
            Pressure::at_elevation(Length::from_meters(row.input("H_gpm")))
        };
        match pressure {
            Ok(pressure) => tally.row_within(row, pressure.pascals(), row.half_unit() + 1.1e-6 * row.value()),
            // 20 km: above the lowest layer
            Err(_) => assert!(row.text("id").contains("20000")),
        }
    }
    tally.finish(13);
}
