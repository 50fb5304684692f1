//! Steps and start of the density, and the release's tables.

use std::println;

use super::*;
use crate::checks::{Table, Tally};

/// Saturation pressure, Pa, by Hyland and Wexler 1983: near enough for the edge of the domain.
fn saturation(celsius: f64) -> f64 {
    Real::exp(crate::saturation::hyland_wexler_liquid(celsius + ZERO_CELSIUS).0)
}

/// What a few Newton steps leave of the enthalpy, J/kg, against many: 0 to 400 °C, 500 Pa to 1.6 MPa, up to saturation.
fn left_over<const STEPS: usize>() -> f64 {
    let mut worst = 0.0_f64;
    for celsius in (0..=400).map(f64::from) {
        let most = if celsius < 201.0 { saturation(celsius).min(1.6e6) } else { 1.6e6 };
        for share in 0..=20 {
            let pascals = 500.0 * Real::exp(Real::ln(most / 500.0) * f64::from(share) / 20.0);
            let off =
                at_after::<f64, STEPS>(celsius, pascals).enthalpy - at_after::<f64, 12>(celsius, pascals).enthalpy;
            worst = worst.max(off.abs());
        }
    }
    println!("superheated steam: {STEPS} steps leave {worst:e} J/kg");
    worst
}

#[test]
fn density_steps_are_enough_and_none_is_idle() {
    assert!(left_over::<DENSITY_STEPS>() < 1e-4);
    assert!(left_over::<{ DENSITY_STEPS - 1 }>() > 1e-4, "one step fewer does as well: the constant is stale");
}

/// Table 8 at 275 and 450 K: at the saturation pressure, and from the side of the vapor; Table 7 at 500 K.
#[test]
fn tables_of_r6_95() {
    let table = Table::read(include_str!("../../../../tests/published/r6_95_iapws95.csv"));
    let of = |quantity: &str, inputs: &str| {
        let mut rows = table.rows().filter(|row| row.text("quantity") == quantity && row.text("inputs") == inputs);
        rows.next().unwrap()
    };
    let mut tally = Tally::new("superheated steam, R6-95 Tables 7 and 8");
    for kelvins in ["T_K=275", "T_K=450"] {
        let pressure = of("p_sat (saturation)", kelvins).value();
        let celsius = of("h_vap (saturation)", kelvins).input("T_K") - ZERO_CELSIUS;
        let steam = at(celsius, pressure);
        tally.row(of("h_vap (saturation)", kelvins), steam.enthalpy);
        tally.row(of("rho_vap (saturation)", kelvins), 1.0 / steam.volume);
        tally.row(of("s_vap (saturation)", kelvins), (steam.enthalpy - steam.gibbs) / (celsius + ZERO_CELSIUS));
    }
    for inputs in ["T_K=500;rho_kg_m3=0.435", "T_K=500;rho_kg_m3=4.532"] {
        let (pressure, entropy) = (of("p", inputs), of("s", inputs));
        let steam = at(500.0 - ZERO_CELSIUS, pressure.value());
        tally.row(entropy, (steam.enthalpy - steam.gibbs) / 500.0);
        let density = pressure.input("rho_kg_m3");
        tally.within("density", pressure.text("id"), 1.0 / steam.volume, density, 1e-9 * density);
    }
    tally.finish(10);
}
