//! The standard atmosphere below 11 km: ISO 2533:1975 (geopotential altitude), US Standard Atmosphere 1976 (geometric altitude).

use moistair_core::{Length, Pressure, Temperature};
use moistair_tests::checks::{Row, Table, Tally};

const TABLE: &str = include_str!("standard_atmosphere.csv");

/// The altitude of a row, and whether it is geometric.
fn altitude(row: Row<'_>) -> (Length, bool) {
    let geometric = row.text("id").starts_with("US76");
    (Length::from_meters(row.input(if geometric { "Z_m" } else { "H_gpm" })), geometric)
}

fn pressure(altitude: Length, geometric: bool) -> Option<f64> {
    let made = if geometric { Pressure::at_geometric_elevation(altitude) } else { Pressure::at_elevation(altitude) };
    made.ok().map(Pressure::pascals)
}

/// The figures are from memory. ISO 2533's gas constant (287.05287) and the molar mass of US 1976 (28.9644) differ by 7e-7, which
/// is 1.1e-6 of the pressure at 11 km; the rest is print.
fn tolerance(row: Row<'_>) -> f64 {
    row.half_unit() + 1.1e-6 * row.value()
}

/// Rows of a quantity in the lowest layer; at 20 km there is no value.
fn rows<'a>(table: &'a Table, quantity: &'a str) -> impl Iterator<Item = Row<'a>> {
    table.rows().filter(move |row| row.text("quantity") == quantity && !row.text("id").contains("20000"))
}

#[test]
fn standard_atmosphere() {
    let table = Table::read(TABLE);
    let mut tally = Tally::new("standard atmosphere");
    for row in rows(&table, "p") {
        let (altitude, geometric) = altitude(row);
        tally.row_within(row, pressure(altitude, geometric).unwrap(), tolerance(row));
    }
    for row in rows(&table, "T") {
        let (altitude, geometric) = altitude(row);
        let made =
            if geometric { Temperature::at_geometric_elevation(altitude) } else { Temperature::at_elevation(altitude) };
        tally.row(row, made.unwrap().kelvins());
    }
    for row in table.rows().filter(|row| row.text("id").contains("20000")) {
        let (altitude, geometric) = altitude(row);
        assert!(pressure(altitude, geometric).is_none() && Temperature::at_elevation(altitude).is_err());
    }
    tally.finish(28);
}

/// The other way: the print of a pressure is an altitude of as much over the slope, which the neighbors of the altitude give.
#[test]
fn elevation_of_a_pressure() {
    let table = Table::read(TABLE);
    let mut tally = Tally::new("elevation of a pressure");
    for row in rows(&table, "p") {
        let (altitude, geometric) = altitude(row);
        let meters = altitude.meters();
        let near = |meters| pressure(Length::from_meters(meters), geometric).unwrap();
        let slope =
            (near(meters - 5.0) - near((meters + 5.0).min(11_000.0))) / ((meters + 5.0).min(11_000.0) - meters + 5.0);
        let reading = Pressure::from_pascals(row.value());
        let found = if geometric {
            Length::geometric_elevation_at_pressure(reading)
        } else {
            Length::elevation_at_pressure(reading)
        };
        tally.within("elevation", row.text("id"), found.unwrap().meters(), meters, tolerance(row) / slope);
    }
    tally.finish(14);
}

/// There and back to a few units in the last place of the radius-long way; the ends come back as the ends.
#[test]
fn there_and_back() {
    let mut most = 0.0_f64;
    for step in 0..=1_600 {
        let meters = -5_000.0 + 10.0 * f64::from(step);
        let elevation = Length::from_meters(meters);
        let plain = Length::elevation_at_pressure(Pressure::at_elevation(elevation).unwrap()).unwrap();
        let geometric =
            Length::geometric_elevation_at_pressure(Pressure::at_geometric_elevation(elevation).unwrap()).unwrap();
        most = most.max((plain.meters() - meters).abs()).max((geometric.meters() - meters).abs());
    }
    println!("elevation there and back: {most:e} m");
    assert!(most < 1e-10);
    for pascals in [22_600.0, 177_800.0 + 1e3, 300_000.0, 1.0, f64::NAN] {
        let reading = Pressure::from_pascals(pascals);
        assert!(Length::<f64>::elevation_at_pressure(reading).is_err());
        assert!(Length::<f64>::geometric_elevation_at_pressure(reading).is_err());
    }
}
