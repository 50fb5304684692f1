//! The real gas against IAPWS G8-10 in full.

use moistair_core::*;
use moistair_tests::checks::{Random, Table, Tally};
use moistair_tests::helmholtz_reference as reference;

/// The reference itself: G8-10 Tables 13 and 14, R6-95 Table 7 (pressure and entropy, liquid to near critical).
#[test]
fn reference_holds_its_own_tables() {
    let table = Table::read(include_str!("g8_10_tables13_14_15.csv"));
    let mut tally = Tally::new("reference, G8-10 Tables 13 and 14");
    for row in table.rows() {
        let (a, t, rho) = (row.input("A"), row.input("T_K"), row.input("rho_kg_m3"));
        let f = match row.text("quantity").split_once(" [").map_or("", |(_, part)| part) {
            "humid air]" => reference::helmholtz(a, t, rho),
            "water vapour part f^V at rho_V]" => reference::water(t, (1.0 - a) * rho),
            _ => continue,
        };
        let [f_a, f_t, f_rho] = f.slopes;
        let computed = match row.text("quantity").split(' ').next().unwrap() {
            "f" => f.value,
            "f_A" => f_a,
            "f_T" => f_t,
            "f_rho" => f_rho,
            "mu_W" => f.value + rho * f_rho - a * f_a,
            "p" => rho * rho * f_rho,
            "h" => f.value - t * f_t + rho * f_rho,
            "g" => f.value + rho * f_rho,
            "s" => -f_t,
            _ => continue, // second derivatives
        };
        tally.row(row, computed);
    }
    tally.finish(36);

    let table = Table::read(include_str!("r6_95_iapws95.csv"));
    let mut tally = Tally::new("reference, R6-95 Table 7");
    for row in table.rows().filter(|row| ["p", "s"].contains(&row.text("quantity"))) {
        let (t, rho) = (row.input("T_K"), row.input("rho_kg_m3"));
        let f = reference::water(t, rho);
        let computed = if row.text("quantity") == "p" { rho * rho * f.slopes[2] } else { -f.slopes[1] };
        tally.row(row, computed);
    }
    tally.finish(22);

    let table = Table::read(include_str!("r10_06_ice.csv"));
    let mut tally = Tally::new("reference, R10-06 Table 6");
    for row in table.rows().filter(|row| row.text("quantity") == "g") {
        // Doubles carry a difference of terms near 6e5 J/kg to 1e-9.
        let computed = reference::ice_potential(row.input("T_K"), row.input("p_Pa"));
        tally.row_within(row, computed, row.half_unit().max(1e-9));
    }
    tally.finish(3);
}

/// A band of the domain and what the real gas may differ in it: relative, but for the enthalpy.
struct Band {
    name: &'static str,
    celsius: (f64, f64),
    pascals: (f64, f64),
    density: f64,
    /// J/kg
    enthalpy: f64,
    saturation: f64,
}

/// Density, volume, enthalpy and saturation at seeded points. What is left is the order of density cut off: of dry air the sixth,
/// of water the seventh.
#[test]
fn real_gas_against_g8_10() {
    let bands = [
        Band {
            name: "below 60 °C and 120 kPa",
            celsius: (-80.0, 60.0),
            pascals: (20e3, 120e3),
            density: 1e-9,
            enthalpy: 1e-8,
            saturation: 1e-9,
        },
        Band {
            name: "whole domain",
            celsius: (-80.0, 150.0),
            pascals: (20e3, 1.1e6),
            density: 1e-7,
            enthalpy: 5e-3,
            saturation: 1e-7,
        },
    ];
    let mut random = Random(0x6738_3130);
    for band in bands {
        let (mut points, mut saturations) = (0, 0);
        let mut worst = [(0.0_f64, (0.0, 0.0)); 4];
        while points < 2_000 {
            let celsius = random.between(band.celsius.0, band.celsius.1);
            let pascals = (random.between(band.pascals.0.ln(), band.pascals.1.ln())).exp();
            let kelvins = celsius + 273.15;
            let share = random.between(0.0, 1.0);
            let site: Pressure = Pressure::from_pascals(pascals);
            let saturated = MoistAir::from_dry_bulb(
                Temperature::from_celsius(celsius),
                DegreeOfSaturation::from_fraction(1.0),
                site,
            );
            let limit = saturated.map_or(1.0, |air| air.humidity_ratio().kilograms_per_kilogram());
            let ratio = HumidityRatio::from_kilograms_per_kilogram(share * limit);
            let air = MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), ratio, site).unwrap();
            let w = air.humidity_ratio().kilograms_per_kilogram();
            let a = 1.0 / (1.0 + w);
            let rho = reference::density(a, kelvins, pascals);
            let f = reference::helmholtz(a, kelvins, rho);
            let h = (f.value - kelvins * f.slopes[1] + rho * f.slopes[2]) * (1.0 + w);
            let mut note = |i: usize, error: f64| {
                assert!(error.is_finite());
                if error.abs() > worst[i].0 {
                    worst[i] = (error.abs(), (celsius, pascals));
                }
            };
            note(0, air.density().kilograms_per_cubic_meter() / rho - 1.0);
            note(1, air.specific_volume().cubic_meters_per_kilogram() / ((1.0 + w) / rho) - 1.0);
            note(2, air.specific_enthalpy().joules_per_kilogram() - h);
            if let Ok(saturated) = saturated {
                let ours = saturated.humidity_ratio().kilograms_per_kilogram();
                let stable_over_ice = reference::ice_potential(kelvins, pascals) < reference_liquid(kelvins, pascals);
                let condensed = if stable_over_ice {
                    reference::ice_potential(kelvins, pascals)
                } else {
                    reference::liquid_potential(kelvins, pascals)
                };
                let theirs = reference::saturation_ratio(kelvins, pascals, condensed, ours);
                note(3, saturated.water_mole_fraction().fraction() / reference::mole_fraction(theirs) - 1.0);
                saturations += 1;
            }
            points += 1;
        }
        println!("{}: {points} points, {saturations} saturations", band.name);
        for (name, (error, at)) in ["density", "volume", "enthalpy, J/kg", "x_ws"].iter().zip(worst) {
            println!("  {name}: at most {error:e} at {at:?} °C, Pa");
        }
        assert!(worst[0].0 < band.density && worst[1].0 < band.density);
        assert!(worst[2].0 < band.enthalpy && worst[3].0 < band.saturation);
        assert!(saturations > 1_000);
    }
}

/// Below −20 °C ice is stable beyond question, and R6-95's liquid nears its limit.
fn reference_liquid(kelvins: f64, pascals: f64) -> f64 {
    if kelvins < 253.15 { f64::INFINITY } else { reference::liquid_potential(kelvins, pascals) }
}

/// Saturation pressure of pure water against the equilibrium of the same equations in full, R6-95 and R10-06. What is left is the
/// order of density cut off, felt above 100 °C.
#[test]
fn pure_saturation_against_the_full_equations() {
    let mut worst = [(0.0_f64, 0); 2];
    for celsius in (-80..=150).filter(|&celsius| celsius != 0) {
        let t = f64::from(celsius);
        let air = MoistAir::from_dry_bulb(
            Temperature::from_celsius(t),
            HumidityRatio::from_kilograms_per_kilogram(0.0),
            Pressure::from_kilopascals(101.325),
        );
        let ours = air.unwrap().saturation_pressure().unwrap().pascals();
        let kelvins = t + 273.15;
        let condensed = |p| {
            if celsius < 0 { reference::ice_potential(kelvins, p) } else { reference::liquid_potential(kelvins, p) }
        };
        let error = (ours / reference::saturation_pressure(kelvins, condensed, ours) - 1.0).abs();
        assert!(error.is_finite(), "{celsius}");
        let slot = &mut worst[usize::from(celsius > 100)];
        *slot = if error > slot.0 { (error, celsius) } else { *slot };
    }
    println!("saturation pressure, −80 to 100 °C and above: {worst:?}");
    assert!(worst[0].0 < 1e-12 && worst[1].0 < 1e-11);
}
