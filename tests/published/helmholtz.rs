//! The real gas and the Helmholtz formulation against IAPWS G8-10 in full, and its Table 13 through states.

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

/// A band of the domain and what a formulation may differ in it: relative, but for what has its unit beside it.
struct Band {
    formulation: Formulation,
    name: &'static str,
    celsius: (f64, f64),
    pascals: (f64, f64),
    density: f64,
    /// J/kg
    enthalpy: f64,
    saturation: f64,
    /// J/(kg K)
    entropy: f64,
    /// J/kg
    potential: f64,
}

/// Density, volume, enthalpy, saturation, entropy and chemical potentials at seeded points. What is left of the real gas are its fits, and under
/// pressure the order of density cut off: of dry air the sixth, of water the seventh; of the Helmholtz formulation rounding. The reference knows the water as
/// 1 − A, which leaves few digits of little: μ_w is compared above 10 g/kg, and errors of saturation are weighed by W / (W + 1e-5).
#[test]
fn formulations_against_g8_10() {
    let bands = [
        Band {
            formulation: Formulation::RealGas,
            name: "real gas, below 60 °C and 120 kPa",
            celsius: (-80.0, 60.0),
            pascals: (20e3, 120e3),
            density: 1e-11,
            enthalpy: 3e-5,
            saturation: 2e-9,
            entropy: 5e-8,
            potential: 1e-6,
        },
        Band {
            formulation: Formulation::RealGas,
            name: "real gas, whole domain",
            celsius: (-80.0, 150.0),
            pascals: (20e3, 1.1e6),
            density: 1e-7,
            enthalpy: 5e-3,
            saturation: 1e-7,
            entropy: 2e-5,
            potential: 5e-3,
        },
        Band {
            formulation: Formulation::Helmholtz,
            name: "Helmholtz, whole domain",
            celsius: (-80.0, 200.0),
            pascals: (20e3, 5e6),
            density: 1e-13,
            enthalpy: 1e-8,
            saturation: 1e-10,
            entropy: 1e-10,
            potential: 1e-8,
        },
    ];
    let mut random = Random(0x6738_3130);
    for band in bands {
        let (mut points, mut saturations) = (0, 0);
        let mut worst = [(0.0_f64, (0.0, 0.0)); 7];
        while points < 2_000 {
            let celsius = random.between(band.celsius.0, band.celsius.1);
            let pascals = (random.between(band.pascals.0.ln(), band.pascals.1.ln())).exp();
            let kelvins = celsius + 273.15;
            let share = random.between(0.0, 1.0);
            let site: Basis = Basis::new(Pressure::from_pascals(pascals), band.formulation);
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
            let (potential, [f_a, f_t, f_rho]) = (f.value + rho * f.slopes[2], f.slopes);
            let entropy = air.specific_entropy().joules_per_kilogram_kelvin();
            note(4, (entropy + f_t * (1.0 + w)) / (1.0 + w));
            assert!(f_rho > 0.0);
            if w > 1e-2 {
                let water = air.chemical_potential_of_water().unwrap().joules_per_kilogram();
                note(5, water - (potential - a * f_a));
            }
            note(6, air.chemical_potential_of_dry_air().joules_per_kilogram() - (potential + (1.0 - a) * f_a));
            if let Ok(saturated) = saturated {
                let ours = saturated.humidity_ratio().kilograms_per_kilogram();
                let stable_over_ice = reference::ice_potential(kelvins, pascals) < reference_liquid(kelvins, pascals);
                let condensed = if stable_over_ice {
                    reference::ice_potential(kelvins, pascals)
                } else {
                    reference::liquid_potential(kelvins, pascals)
                };
                let theirs = reference::saturation_ratio(kelvins, pascals, condensed, ours);
                let error = saturated.water_mole_fraction().fraction() / reference::mole_fraction(theirs) - 1.0;
                note(3, error * theirs / (theirs + 1e-5));
                saturations += 1;
            }
            points += 1;
        }
        println!("{}: {points} points, {saturations} saturations", band.name);
        let names = ["density", "volume", "enthalpy, J/kg", "x_ws", "entropy, J/(kg K)", "μ_w, J/kg", "μ_a, J/kg"];
        for (name, (error, at)) in names.iter().zip(worst) {
            println!("  {name}: at most {error:e} at {at:?} °C, Pa");
        }
        assert!(worst[0].0 < band.density && worst[1].0 < band.density);
        assert!(worst[2].0 < band.enthalpy && worst[3].0 < band.saturation);
        assert!(worst[4].0 < band.entropy && worst[5].0.max(worst[6].0) < band.potential);
        assert!(saturations > 1_000);
    }
}

/// Below −20 °C ice is stable beyond question, and R6-95's liquid nears its limit.
fn reference_liquid(kelvins: f64, pascals: f64) -> f64 {
    if kelvins < 253.15 { f64::INFINITY } else { reference::liquid_potential(kelvins, pascals) }
}

/// Saturation pressure of pure water against the equilibrium of the same equations in full, R6-95 and R10-06. What is left of the real gas are
/// its fits.
#[test]
fn pure_saturation_against_the_full_equations() {
    pure_saturation(Formulation::Helmholtz, 1e-12);
    pure_saturation(Formulation::RealGas, 3e-9);
}

fn pure_saturation(formulation: Formulation, bound: f64) {
    let mut worst = (0.0_f64, 0);
    let (_, warmest) = formulation.limits(Quantity::DryBulb);
    for celsius in (-80..=200).filter(|&celsius| celsius != 0 && f64::from(celsius) <= warmest) {
        let t = f64::from(celsius);
        let air = MoistAir::from_dry_bulb(
            Temperature::from_celsius(t),
            HumidityRatio::from_kilograms_per_kilogram(0.0),
            Basis::new(Pressure::from_kilopascals(101.325), formulation),
        );
        let ours = air.unwrap().saturation_pressure().unwrap().pascals();
        let kelvins = t + 273.15;
        let condensed = |p| {
            if celsius < 0 { reference::ice_potential(kelvins, p) } else { reference::liquid_potential(kelvins, p) }
        };
        let error = (ours / reference::saturation_pressure(kelvins, condensed, ours) - 1.0).abs();
        assert!(error.is_finite(), "{celsius}");
        worst = if error > worst.0 { (error, celsius) } else { worst };
    }
    println!("saturation pressure, {formulation:?}, −80 to {warmest} °C: {worst:?}");
    assert!(worst.0 < bound);
}

/// G8-10 Table 13 at 300 K and 400 K through states of the Helmholtz formulation (the third column, 200 K and 1 Pa, is none): what moist air of a
/// given composition and pressure has. Composition and pressure are printed with nine digits, and what these are worth is allowed
/// beside the print: the column of 400 K is saturated, and as printed lies 4e-9 beyond, so that the states are one unit of the ninth digit drier.
#[test]
fn table_13_of_g8_10_through_states() {
    let table = Table::read(include_str!("g8_10_tables13_14_15.csv"));
    let rows = || table.rows().filter(|row| row.text("quantity").ends_with("[humid air]") && row.input("T_K") > 250.0);
    let mut tally = Tally::new("G8-10 Table 13, states");
    for row in rows() {
        let (a, kelvins, rho) = (row.input("A"), row.input("T_K"), row.input("rho_kg_m3"));
        let same = |other: &moistair_tests::checks::Row<'_>| (other.input("T_K") - kelvins).abs() < 1.0;
        let p = rows().filter(same).find(|other| other.text("quantity").starts_with("p ")).unwrap();
        let computed = |a: f64, pascals: f64| {
            let site: Basis = Basis::helmholtz(Pressure::from_pascals(pascals));
            let water = SpecificHumidity::from_kilograms_per_kilogram(1.0 - a);
            let air = MoistAir::from_dry_bulb(Temperature::from_celsius(kelvins - 273.15), water, site).unwrap();
            let (h, s) = (air.specific_enthalpy().joules_per_kilogram(), air.specific_entropy());
            let water = air.chemical_potential_of_water().unwrap().joules_per_kilogram();
            let dry_air = air.chemical_potential_of_dry_air().joules_per_kilogram();
            let cv = air.specific_heat_at_constant_volume().joules_per_kilogram_kelvin();
            Some(match row.text("quantity").split(' ').next().unwrap() {
                "h" => a * h,
                "s" => a * s.joules_per_kilogram_kelvin(),
                "cp" => a * air.specific_heat().joules_per_kilogram_kelvin(),
                "w" => air.speed_of_sound().meters_per_second(),
                "g" => a * dry_air + (1.0 - a) * water,
                "mu_W" => water,
                "f_A" => dry_air - water,
                "f" => a * dry_air + (1.0 - a) * water - pascals / rho,
                "f_T" => -a * s.joules_per_kilogram_kelvin(),
                "f_TT" => -a * cv / kelvins,
                "f_rho" => pascals / (rho * rho),
                "p" => pascals * air.density().kilograms_per_cubic_meter() / rho,
                _ => return None, // mixed second derivatives
            })
        };
        let drier = a + 1e-9;
        let Some(value) = computed(drier, p.value()) else { continue };
        let of_composition = 1.5 * (computed(drier + 1e-9, p.value()).unwrap() - value);
        let of_pressure = computed(drier, p.value() + p.half_unit()).unwrap() - value;
        // A density of nine digits where one is used.
        let of_density = if ["f [", "p [", "f_rho "].iter().any(|name| row.text("quantity").starts_with(name)) {
            2.0 * 5e-9 * pascals_over(p.value(), rho, row.text("quantity"))
        } else {
            0.0
        };
        tally.row_within(row, value, row.half_unit() + of_composition.abs() + of_pressure.abs() + of_density);
    }
    tally.finish(24);
}

/// The size of what density enters.
fn pascals_over(pascals: f64, rho: f64, quantity: &str) -> f64 {
    match quantity.split(' ').next().unwrap() {
        "f" => pascals / rho,
        "f_rho" => pascals / (rho * rho),
        _ => pascals,
    }
}
