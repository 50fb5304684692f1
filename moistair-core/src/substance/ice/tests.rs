//! R10-06 Table 6 in full: the second derivatives, which no state needs, are formed here.
#![allow(clippy::disallowed_methods, reason = "an independent evaluation uses the platform's functions")]

use super::*;
use crate::checks::{Table, Tally};

const ICE: &str = include_str!("../../../../tests/published/r10_06_ice.csv");

/// g_pp, g_Tp, g_TT: R10-06 Table 4.
fn second_derivatives(kelvins: f64, pascals: f64) -> (f64, f64, f64) {
    let tau = kelvins / TRIPLE_TEMPERATURE;
    let y = (pascals - NORMAL_PRESSURE) / TRIPLE_PRESSURE;
    let vibration = Vibration::at(T2, tau);
    let curvature = |t: Complex<f64>| {
        let (below, above) = (Complex { re: t.re - tau, im: t.im }, Complex { re: t.re + tau, im: t.im });
        below.inverse().plus(above.inverse()).minus(t.inverse().scaled(2.0))
    };
    let r2 = R20.plus(R21.scaled(y)).plus(R22.scaled(y * y));
    let r2_y = R21.plus(R22.scaled(2.0 * y));
    let g0_yy = polynomial(y, [2.0 * G0[2], 6.0 * G0[3], 12.0 * G0[4]]);
    let of_pressure = g0_yy + TRIPLE_TEMPERATURE * R22.scaled(2.0).times(vibration.value).re;
    let of_temperature = R1.times(curvature(T1)).plus(r2.times(curvature(T2))).re;
    (
        of_pressure / (TRIPLE_PRESSURE * TRIPLE_PRESSURE),
        r2_y.times(vibration.slope).re / TRIPLE_PRESSURE,
        of_temperature / TRIPLE_TEMPERATURE,
    )
}

/// All 48 values: triple point, normal melting point, and 100 K at 100 MPa.
#[test]
fn ice_of_r10_06() {
    let table = Table::read(ICE);
    let mut tally = Tally::new("R10-06 Table 6");
    for row in table.rows() {
        let (kelvins, pascals) = (row.input("T_K"), row.input("p_Pa"));
        // The subtraction of 273.15 K costs 4e-14 K, 5e-11 J/kg: less than any digit here.
        let ice = equation(kelvins - ZERO_CELSIUS, pascals);
        let (g_pp, g_tp, g_tt) = second_derivatives(kelvins, pascals);
        let entropy = (ice.enthalpy - ice.gibbs) / kelvins;
        let computed = match row.text("quantity").split(' ').next().unwrap() {
            "g" => ice.gibbs,
            "g_p" => ice.volume,
            "g_T" => -entropy,
            "g_pp" => g_pp,
            "g_Tp" => g_tp,
            "g_TT" => g_tt,
            "h" => ice.enthalpy,
            "f" => ice.gibbs - pascals * ice.volume,
            "u" => ice.enthalpy - pascals * ice.volume,
            "s" => entropy,
            "cp" => -kelvins * g_tt,
            "rho" => 1.0 / ice.volume,
            "alpha" => g_tp / ice.volume,
            "beta" => -g_tp / g_pp,
            "kappa_T" => -g_pp / ice.volume,
            "kappa_s" => (g_tp * g_tp - g_tt * g_pp) / (ice.volume * g_tt),
            name => panic!("{name}"),
        };
        // Energies are differences of terms near 6e5 J/kg: doubles carry them to 1e-9 J/kg, less than Table 6 prints.
        let energy = ["g", "h", "f", "u"].contains(&row.text("quantity"));
        tally.row_within(row, computed, if energy { row.half_unit().max(1e-9) } else { row.half_unit() });
    }
    tally.finish(48);
}
