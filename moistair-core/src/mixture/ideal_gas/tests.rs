//! The perfect-gas relations against the handbook's own figures, and the joint of its saturation curves.
#![allow(clippy::disallowed_methods, reason = "an independent evaluation uses the platform's functions")]

use std::println;

use super::*;
use crate::checks::Tally;

/// ln p over liquid and over ice as printed in the chapter, term by term.
fn as_printed(kelvins: f64) -> (f64, f64) {
    let t = kelvins;
    let liquid = -5.8002206e3 / t + 1.3914993 - 4.8640239e-2 * t + 4.1764768e-5 * t * t - 1.4452093e-8 * t.powi(3)
        + 6.5459673 * t.ln();
    let ice = -5.6745359e3 / t + 6.3925247 - 9.6778430e-3 * t + 6.2215701e-7 * t * t + 2.0747825e-9 * t.powi(3)
        - 9.4840240e-13 * t.powi(4)
        + 4.1635019 * t.ln();
    (liquid, ice)
}

#[test]
fn saturation_as_printed() {
    for celsius in -100..=200 {
        let kelvins = f64::from(celsius) + ZERO_CELSIUS;
        let (liquid, ice) = as_printed(kelvins);
        assert!((hyland_wexler_liquid(kelvins).0 - liquid).abs() < 1e-13, "{celsius} °C");
        assert!((hyland_wexler_ice(kelvins).0 - ice).abs() < 1e-13, "{celsius} °C");
        let (step, function) = (1e-3, [hyland_wexler_liquid::<f64>, hyland_wexler_ice]);
        for f in function {
            let central = (f(kelvins + step).0 - f(kelvins - step).0) / (2.0 * step);
            assert!((central / f(kelvins).1 - 1.0).abs() < 1e-9, "{celsius} °C: {central}");
        }
    }
}

/// Hyland and Wexler's pressures in kPa as tabulated in the handbook's editions before 2009 (Table 3 of chapter 6, ed. 2005; from
/// memory), and their triple point 611.657 Pa at 0.01 °C, to which they constrained both curves.
#[test]
fn saturation_pressures_of_hyland_and_wexler() {
    let mut tally = Tally::new("Hyland and Wexler 1983");
    for (celsius, kilopascals) in [(20.0, 2.3388), (25.0, 3.1692), (30.0, 4.2460), (0.01, 0.611657)] {
        let computed = IdealGas::at(celsius).pure_saturation_pressure(101_325.0, Surface::Liquid) / 1e3;
        let half_unit = if celsius < 1.0 { 0.5e-6 } else { 0.5e-4 };
        tally.within("over liquid", &std::format!("{celsius} °C"), computed, kilopascals, half_unit);
    }
    let ice = IdealGas::at(0.01).pure_saturation_pressure(101_325.0, Surface::Ice) / 1e3;
    tally.within("over ice", "0.01 °C", ice, 0.611657, 0.5e-6);
    tally.finish(5);
}

/// The curves meet at `MELTING` to the last bits: nothing steps there, and the slope of the logarithm falls by an eighth.
#[test]
fn curves_meet_at_the_melting_temperature() {
    let (liquid, ice) = as_printed(MELTING + ZERO_CELSIUS);
    println!("ln p at {MELTING} °C: liquid {liquid}, ice {ice}");
    assert!((liquid - ice).abs() < 4e-15, "{liquid} {ice}");
    // In a hundredth of a kelvin to either side they have parted again, in opposite senses.
    let gap = |celsius: f64| {
        let (liquid, ice) = as_printed(celsius + ZERO_CELSIUS);
        liquid - ice
    };
    assert!(gap(MELTING - 0.01) > 9e-5 && gap(MELTING + 0.01) < -9e-5);
    let at = |celsius: f64| IdealGas::at(celsius).saturation(101_325.0, Surface::Stable);
    let (below, above) = (at(MELTING - 1e-12), at(MELTING));
    assert!((above.mole_fraction / below.mole_fraction - 1.0).abs() < 1e-13);
    let fall = below.log_slope / above.log_slope;
    assert!((1.12..1.14).contains(&fall), "{fall}");
    // Sublimation at 0 °C: 2501 + 333.4 kJ/kg.
    let zero = IdealGas::<f64>::at(0.0);
    assert!((zero.vapor_enthalpy() - zero.condensed(Surface::Ice) - 2_834_400.0).abs() < 1e-6);
}

/// d ln W_s/dT against central differences.
#[test]
fn slope_of_saturation() {
    for celsius in [-79.0, -20.0, 5.0, 40.0, 90.0] {
        let ln_ratio = |t: f64| IdealGas::at(t).saturation(101_325.0, Surface::Stable).humidity_ratio.ln();
        let slope = IdealGas::at(celsius).saturation(101_325.0, Surface::Stable).log_slope;
        let central = (ln_ratio(celsius + 1e-3) - ln_ratio(celsius - 1e-3)) / 2e-3;
        assert!((central / slope - 1.0).abs() < 1e-6, "{celsius} °C: {central} {slope}");
    }
}
