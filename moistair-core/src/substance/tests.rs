//! The pure substances against the tables of their releases.
#![allow(clippy::disallowed_methods, reason = "an independent evaluation uses the platform's functions")]

use super::critical_region::cusps;
use super::*;
use crate::checks::{Row, Table, Tally};

const WATER: &str = include_str!("../../../tests/published/r6_95_iapws95.csv");
const COLD: &str = include_str!("../../../tests/published/g9_12_low_temperature.csv");

/// `φ`, `δφ_δ`, `δ²φ_δδ`, `τφ_τ`, `τ²φ_ττ`, `δτφ_δτ` of the vapor as the mixture uses it, ideal and residual.
fn vapor(kelvins: f64, density: f64) -> ([f64; 6], [f64; 6]) {
    let delta = density / water_vapor::REDUCING_DENSITY;
    let ideal = water_vapor::ideal(kelvins);
    let ideal = [delta.ln() + ideal.value, 1.0, -1.0, ideal.first, ideal.second, 0.0];
    let mut residual = [0.0; 6];
    for (order, jet) in (1..).zip(water_vapor::residual(kelvins)) {
        let (k, power) = (f64::from(order), delta.powi(order));
        let parts = [jet.value, k * jet.value, k * (k - 1.0) * jet.value, jet.first, jet.second, k * jet.first];
        residual.iter_mut().zip(parts).for_each(|(sum, part)| *sum += part * power);
    }
    (ideal, residual)
}

/// p, c_v, w and s from a Helmholtz energy: R6-95 Table 3.
fn property(name: &str, kelvins: f64, density: f64, (ideal, residual): ([f64; 6], [f64; 6])) -> f64 {
    let [value, _, _, tau, tau_tau, _] = core::array::from_fn(|i| ideal[i] + residual[i]);
    let [_, delta, delta_delta, _, _, delta_tau] = residual;
    let r = water::GAS_CONSTANT;
    match name {
        "p" => density * r * kelvins * (1.0 + delta),
        "cv" => -r * tau_tau,
        "s" => r * (tau - value),
        "w" => {
            let slope = 1.0 + delta - delta_tau;
            (r * kelvins * (1.0 + 2.0 * delta + delta_delta - slope * slope / tau_tau)).sqrt()
        }
        _ => panic!("{name}"),
    }
}

/// φʳ, δφʳ_δ, δ²φʳ_δδ, τφʳ_τ, τ²φʳ_ττ, δτφʳ_δτ of water, terms 1 to 51.
fn residual_of_water(delta: f64, tau: f64) -> [f64; 6] {
    cusps::of(&Terms::at(Jet::zero(), &water::TERMS, tau), delta)
}

fn state_of(row: Row<'_>) -> (f64, f64) {
    (row.input("T_K"), row.input("rho_kg_m3"))
}

/// φ° as [`property`] wants it.
fn ideal_of_water(kelvins: f64, density: f64) -> [f64; 6] {
    let ideal = water_vapor::ideal(kelvins);
    [(density / water::CRITICAL_DENSITY).ln() + ideal.value, 1.0, -1.0, ideal.first, ideal.second, 0.0]
}

/// δ and τ.
fn reduced(kelvins: f64, density: f64) -> (f64, f64) {
    (density / water::CRITICAL_DENSITY, water::CRITICAL_TEMPERATURE / kelvins)
}

/// φʳ with all terms.
fn complete(kelvins: f64, density: f64) -> [f64; 6] {
    let (delta, tau) = reduced(kelvins, density);
    cusps::residual(delta, tau)
}

/// R6-95 Table 6: the functions themselves at 500 K, 838.025 kg/m³.
#[test]
fn helmholtz_energy_of_water() {
    let table = Table::read(WATER);
    let mut tally = Tally::new("R6-95 Table 6");
    for row in table.rows().filter(|row| row.text("quantity").starts_with("phi")) {
        let (kelvins, density) = state_of(row);
        let (delta, tau) = reduced(kelvins, density);
        let (part, order) = row.text("quantity").split_once('_').unwrap_or((row.text("quantity"), ""));
        let parts = if part == "phi0" { ideal_of_water(kelvins, density) } else { complete(kelvins, density) };
        let computed = match order {
            "" => parts[0],
            "delta" => parts[1] / delta,
            "deltadelta" => parts[2] / (delta * delta),
            "tau" => parts[3] / tau,
            "tautau" => parts[4] / (tau * tau),
            "deltatau" => parts[5] / (delta * tau),
            name => panic!("{name}"),
        };
        tally.row(row, computed);
    }
    tally.finish(12);
}

/// R6-95, virial coefficients at 600 K: B = a₁/ρ_c, C = 2 a₂/ρ_c².
#[test]
fn virial_coefficients_of_water() {
    let table = Table::read(WATER);
    let mut tally = Tally::new("R6-95 virials");
    for row in table.rows().filter(|row| row.text("quantity").starts_with("virial")) {
        let series = water_vapor::residual(row.input("T_K"));
        let computed = if row.text("quantity").contains('B') {
            series[0].value / water::CRITICAL_DENSITY
        } else {
            2.0 * series[1].value / (water::CRITICAL_DENSITY * water::CRITICAL_DENSITY)
        };
        tally.row(row, computed);
    }
    tally.finish(2);
}

/// R6-95 Table 7, from the gas to 700 MPa and next to the critical point: with all terms; where the density is that of a gas also by
/// the expansion in density; where it is a liquid's also without the terms of the critical region.
#[test]
fn single_phase_water() {
    let table = Table::read(WATER);
    let mut tally = Tally::new("R6-95 Table 7");
    for row in table.rows().filter(|row| ["p", "cv", "w", "s"].contains(&row.text("quantity"))) {
        let (kelvins, density) = state_of(row);
        let name = row.text("quantity");
        let ideal = ideal_of_water(kelvins, density);
        tally.row(row, property(name, kelvins, density, (ideal, complete(kelvins, density))));
        if density < 1.0 {
            tally.row(row, property(name, kelvins, density, vapor(kelvins, density)));
        } else if density > 800.0 && kelvins < 600.0 {
            let (delta, tau) = reduced(kelvins, density);
            tally.row(row, property(name, kelvins, density, (ideal, residual_of_water(delta, tau))));
        }
    }
    tally.finish(44 + 28);
}

/// p, g, h and s of water at a density.
fn phase(kelvins: f64, density: f64) -> (f64, f64, f64, f64) {
    let (ideal, residual) = (ideal_of_water(kelvins, density), complete(kelvins, density));
    let rt = water::GAS_CONSTANT * kelvins;
    let pascals = density * rt * (1.0 + residual[1]);
    let helmholtz = rt * (ideal[0] + residual[0]);
    let energy = rt * (ideal[3] + residual[3]);
    (pascals, helmholtz + pascals / density, energy + pascals / density, (energy - helmholtz) / kelvins)
}

/// Densities of liquid and vapor in equilibrium: Newton for equal pressure and Gibbs energy, dg = dp/ρ.
fn saturation(kelvins: f64, mut liquid: f64, mut vapor: f64) -> (f64, f64) {
    let slope = |density: f64| {
        let residual = complete(kelvins, density);
        water::GAS_CONSTANT * kelvins * (1.0 + 2.0 * residual[1] + residual[2])
    };
    for _ in 0..12 {
        let ((p_l, g_l, ..), (p_v, g_v, ..)) = (phase(kelvins, liquid), phase(kelvins, vapor));
        let (a, b) = (slope(liquid), slope(vapor));
        // p_l + a x = p_v + b y,  g_l + a x / ρ_l = g_v + b y / ρ_v
        let pressure = (g_l - g_v - p_l / liquid + p_v / vapor) / (1.0 / vapor - 1.0 / liquid);
        liquid += (pressure - p_l) / a;
        vapor += (pressure - p_v) / b;
    }
    (liquid, vapor)
}

/// R6-95 Table 8, saturation at 275 K, 450 K and 625 K, with all terms.
#[test]
fn saturated_water() {
    let table = Table::read(WATER);
    let mut tally = Tally::new("R6-95 Table 8");
    for row in table.rows().filter(|row| row.text("quantity").ends_with("(saturation)")) {
        let kelvins = row.input("T_K");
        let start = if kelvins > 600.0 {
            (560.0, 120.0)
        } else if kelvins > 400.0 {
            (890.0, 4.8)
        } else {
            (1_000.0, 5.5e-3)
        };
        let (liquid, vapor) = saturation(kelvins, start.0, start.1);
        let ((_, _, h_l, s_l), (pascals, _, h_v, s_v)) = (phase(kelvins, liquid), phase(kelvins, vapor));
        let computed = match row.text("quantity").split(' ').next().unwrap() {
            "p_sat" => pascals,
            "rho_liq" => liquid,
            "rho_vap" => vapor,
            "h_liq" => h_l,
            "h_vap" => h_v,
            "s_liq" => s_l,
            "s_vap" => s_v,
            name => panic!("{name}"),
        };
        // At 275 K the liquid's enthalpy is printed one unit of the ninth digit off: 7759.72201(5) rounds to …202.
        let units = if row.text("id") == "R695-062" { 2.0 } else { 1.0 };
        tally.row_within(row, computed, units * row.half_unit());
    }
    tally.finish(21);
}

/// What [`water::TERMS`] leaves out, and what the bells of [`critical_region`] leave.
#[test]
fn terms_of_the_critical_region_are_negligible() {
    let largest = |parts: [f64; 6]| parts.iter().fold(0.0_f64, |most, part| most.max(part.abs()));
    let left_out = cusps::of_the_critical_region::<f64>;
    let saturated = |celsius: f64| {
        let kelvins = celsius + crate::quantity::ZERO_CELSIUS;
        let density = crate::saturation::hyland_wexler_liquid(kelvins).0.exp() / (water::GAS_CONSTANT * kelvins);
        (1.2 * density / water::CRITICAL_DENSITY, water::CRITICAL_TEMPERATURE / kelvins) // a little beyond saturation
    };
    let (mut liquid, mut vapor, mut peak) = (0.0_f64, 0.0_f64, 0.0_f64);
    for celsius in (-80..=205).map(f64::from) {
        let tau = water::CRITICAL_TEMPERATURE / (celsius + crate::quantity::ZERO_CELSIUS);
        for pascals in [20e3, 1.1e6, 5e6] {
            let delta = 1.0 / liquid_water::at(celsius, pascals).volume / water::CRITICAL_DENSITY;
            liquid = liquid.max(largest(left_out(delta, tau)) / residual_of_water(delta, tau)[0].abs());
        }
        let (delta, tau) = saturated(celsius);
        peak = peak.max(largest(cusps::cusps(delta, tau)));
        if celsius <= 160.0 {
            vapor = vapor.max(largest(left_out(delta, tau)));
        }
    }
    let (delta, tau) = saturated(200.0);
    let hot = left_out(delta, tau);
    std::println!("terms 52 to 56: of the liquid {liquid:e}; of the vapor to 160 °C {vapor:e}, at 200 °C {hot:?}");
    std::println!("terms 55 and 56 of the vapor: {peak:e}");
    assert!(liquid < 1e-16 && vapor < 1e-12 && peak < 1e-40);
    let [_, pressure, _, energy, heat, _] = hot.map(f64::abs);
    assert!(pressure < 5e-10 && (1e-9..5e-9).contains(&energy) && (1e-7..2e-7).contains(&heat));
}

/// The derivatives of the critical region, with and without the cusps, against central differences.
#[test]
fn critical_region_carries_its_derivatives() {
    type Function = fn(f64, f64) -> cusps::Derivatives<f64>;
    for function in [cusps::of_the_critical_region::<f64> as Function, cusps::cusps, cusps::residual] {
        for (delta, tau) in [(1.1, 1.02), (0.9, 0.99), (0.7, 1.2), (1.3, 1.1), (0.02, 1.35)] {
            let step = 1e-5;
            let (u, v) = (step * delta, step * tau);
            let of_delta = |i: usize| (function(delta + u, tau)[i] - function(delta - u, tau)[i]) / (2.0 * u);
            let of_tau = |i: usize| (function(delta, tau + v)[i] - function(delta, tau - v)[i]) / (2.0 * v);
            let [value, delta_1, delta_2, tau_1, tau_2, mixed] = function(delta, tau);
            let parts = [value, delta_1, delta_2, tau_1, tau_2, mixed];
            let size = parts.iter().fold(1e-12_f64, |most, part| most.max(part.abs()));
            for (central, exact) in [
                (delta * of_delta(0), delta_1),
                (delta * of_delta(1) - delta_1, delta_2),
                (tau * of_tau(0), tau_1),
                (tau * of_tau(3) - tau_1, tau_2),
                (tau * of_tau(1), mixed),
                (delta * of_delta(3), mixed),
            ] {
                assert!((central - exact).abs() < 1e-5 * size, "{delta} {tau}: {central:e} {exact:e}");
            }
        }
    }
}

/// IAPWS G9-12 Table 3: the extension of the ideal part to 50 K.
#[test]
fn ideal_part_in_the_cold() {
    let table = Table::read(COLD);
    let mut tally = Tally::new("G9-12 Table 3");
    for row in table.rows() {
        let kelvins = row.input("T_K");
        let (ideal, extension) = (water_vapor::ideal(kelvins), water_vapor::cold_extension(kelvins));
        let tau = water::CRITICAL_TEMPERATURE / kelvins;
        let computed = match row.text("quantity") {
            "phi_ex" => extension.value,
            "phi_ex_tau" => extension.first / tau,
            "phi_ex_tautau" => extension.second / (tau * tau),
            "cp0/R" => 1.0 - ideal.second - extension.second,
            name => panic!("{name}"),
        };
        tally.row(row, computed);
    }
    tally.finish(8);
    // It begins at 130 K without a step, and states stay above.
    let start = water_vapor::cold_extension(130.0);
    assert!([start.value, start.first, start.second].iter().all(|part: &f64| part.abs() < 1e-14), "{start:?}");
}

/// Temperature derivatives of every jet by central differences: `τ ∂/∂τ = −T ∂/∂T`.
#[test]
fn jets_carry_their_derivatives() {
    type Function = fn(f64) -> std::vec::Vec<Jet<f64>>;
    let functions: [(&str, Function); 4] = [
        ("dry air, ideal", |t| std::vec![dry_air::ideal(t)]),
        ("dry air, residual", |t| dry_air::residual(t).to_vec()),
        ("water, ideal", |t| std::vec![water_vapor::ideal(t)]),
        ("water, residual", |t| water_vapor::residual(t).to_vec()),
    ];
    for (name, function) in functions {
        for kelvins in [193.15, 250.0, 300.0, 423.15] {
            let step = 2e-5 * kelvins;
            let (below, here, above) = (function(kelvins - step), function(kelvins), function(kelvins + step));
            for ((below, here), above) in below.iter().zip(&here).zip(&above) {
                // τ² ∂²/∂τ² = τ∂/∂τ (τ ∂/∂τ) − τ ∂/∂τ
                let slope = |f: fn(&Jet<f64>) -> f64| -kelvins * (f(above) - f(below)) / (2.0 * step);
                let (first, second) = (slope(|jet| jet.value), slope(|jet| jet.first) - here.first);
                let near = |a: f64, b: f64, size: f64| (a - b).abs() <= 3e-6 * (size.abs() + b.abs());
                assert!(near(first, here.first, here.value), "{name} at {kelvins} K: {first} {here:?}");
                assert!(near(second, here.second, here.first), "{name} at {kelvins} K: {second} {here:?}");
            }
        }
    }
}

/// k aₖ δᵏ of each order, its share in p/(ρRT), for orders 1 to 9.
fn orders<const L: usize>(terms: &[Term; L], tau: f64, delta: f64) -> [f64; 9] {
    let series = density_series::<f64, 9, L>(terms, &Term::weights(*terms), tau);
    core::array::from_fn(|i| {
        let order = i as i32 + 1;
        f64::from(order) * series[i].value * delta.powi(order)
    })
}

/// The density at which a series of orders gives a pressure.
fn density_at<const L: usize>(terms: &[Term; L], tau: f64, reducing: f64, ideal: f64) -> f64 {
    (0..60).fold(ideal, |density, _| ideal / (1.0 + orders(terms, tau, density / reducing).iter().sum::<f64>()))
}

/// The claims at [`water_vapor::ORDERS`] and [`dry_air::ORDERS`], printed in full.
#[test]
fn size_of_each_order_of_density() {
    let print = |name: &str, celsius: f64, pascals: f64, orders: [f64; 9]| {
        let text = orders.map(|order| std::format!("{order:.1e}"));
        std::println!("{name} at {celsius} °C, {pascals:.0} Pa, orders 1 to 9: {}", text.join(" "));
    };
    let vapor = [-20.0, 0.0, 20.0, 60.0, 100.0, 150.0].map(|celsius: f64| {
        let kelvins = celsius + crate::quantity::ZERO_CELSIUS;
        let (tau, pascals) =
            (water::CRITICAL_TEMPERATURE / kelvins, crate::saturation::hyland_wexler_liquid(kelvins).0.exp());
        let density =
            density_at(&water::TERMS, tau, water::CRITICAL_DENSITY, pascals / (kelvins * water::GAS_CONSTANT));
        let sizes = orders(&water::TERMS, tau, density / water::CRITICAL_DENSITY);
        print("saturated vapor", celsius, pascals, sizes);
        sizes.map(f64::abs)
    });
    let [.., at_20, _, at_100, at_150] = vapor;
    assert!((2e-9..3e-9).contains(&at_20[5]) && (1.5e-5..2.5e-5).contains(&at_100[5]), "the sixth");
    assert!(at_100[4] < 1e-9 && at_150[4] < 1e-7, "the fifth");
    assert!(at_150[6..].iter().all(|&order| order < 2e-11), "those left out");
    let air = [(-80.0, 1.1e6), (-80.0, 101_325.0), (20.0, 1.1e6), (20.0, 101_325.0), (150.0, 1.1e6)].map(
        |(celsius, pascals): (f64, f64)| {
            let kelvins = celsius + crate::quantity::ZERO_CELSIUS;
            let tau = dry_air::REDUCING_TEMPERATURE / kelvins;
            let ideal = pascals / (kelvins * dry_air::GAS_CONSTANT);
            let density = density_at(&dry_air::TERMS, tau, dry_air::REDUCING_DENSITY, ideal);
            let sizes = orders(&dry_air::TERMS, tau, density / dry_air::REDUCING_DENSITY);
            print("dry air", celsius, pascals, sizes);
            sizes.map(f64::abs)
        },
    );
    assert!((7e-7..9e-7).contains(&air[0][4]) && (5e-8..7e-8).contains(&air[2][4]), "the fifth");
    assert!(air.iter().all(|sizes| sizes[5..].iter().all(|&order| order < 3e-8)), "those left out");
}
