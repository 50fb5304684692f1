//! Publications beside those that the library stands on: each text against its own check values, then against one another.

use moistair_core::{Basis, HumidityRatio, MoistAir, Pressure, Temperature};
use moistair_tests::checks::{Table, Tally, half_of_last_decimal};
use moistair_tests::publications::{cipm_2007, comparisons, henry, saturation};

/// G7-04 Table 6.
#[test]
fn henry_constants() {
    let table = Table::read(include_str!("g7_04_henry.csv"));
    let mut tally = Tally::new("Henry's constants, G7-04 Table 6");
    for row in table.rows() {
        let gas = match row.text("quantity").split(' ').nth(1).unwrap() {
            "N2" => henry::NITROGEN,
            "O2" => henry::OXYGEN,
            "Ar" => henry::ARGON,
            "CO2" => henry::CARBON_DIOXIDE,
            gas => panic!("{gas}"),
        };
        tally.row(row, (henry::constant(gas, row.input("T_K")) / 1e9).ln());
    }
    tally.finish(16);
}

/// R14-08 Table 3 (sublimation), SR1-86 Table 1 (saturation pressure), R7-97 Tables 35 and 36 (region 4).
#[test]
fn saturation_pressures() {
    let table = Table::read(include_str!("sublimation_saturation_melting.csv"));
    let mut tally = Tally::new("saturation pressures in closed form");
    for row in table.rows() {
        let computed = match row.text("quantity") {
            "p_sub" => saturation::sublimation_pressure(row.input("T_K")),
            "p_sat" => saturation::supplementary_release(row.input("T_K")),
            "p_sat region 4" => saturation::region_4(row.input("T_K")),
            "T_sat region 4" => saturation::region_4_temperature(row.input("p_Pa")),
            _ => continue, // densities, enthalpies, melting
        };
        tally.row(row, computed);
    }
    tally.finish(10);
}

/// ASHRAE Fundamentals 2021 ch. 1, Table 3, which takes saturation of water from R7-97 and of ice from R14-08: the same texts at other
/// temperatures.
#[test]
fn saturation_pressures_of_the_handbook() {
    let table = Table::read(include_str!("handbook_table3_water.csv"));
    let mut tally = Tally::new("saturation pressures, handbook Table 3");
    for row in table.rows() {
        let kelvins = row.number("t_C") + 273.15;
        let text =
            if row.text("condensed_phase") == "ice" { saturation::sublimation_pressure } else { saturation::region_4 };
        let tolerance = half_of_last_decimal(row.text("p_ws_kPa"));
        tally.within(
            row.text("condensed_phase"),
            row.text("t_C"),
            text(kelvins) / 1e3,
            row.number("p_ws_kPa"),
            tolerance,
        );
    }
    tally.finish(25);
}

/// CIPM-2007 against what it states beside its equation, and against the simplified formula of OIML R111-1, whose relative uncertainty
/// is 2e-4.
#[test]
fn moist_air_density() {
    let table = Table::read(include_str!("moist_air_density.csv"));
    let gases = Table::read(include_str!("cipm_2007_dry_air.csv"));
    let sum = |weight: &dyn Fn(f64) -> f64| -> f64 {
        gases.rows().map(|gas| gas.number("mole_fraction") * weight(gas.number("molar_mass_kg_mol"))).sum()
    };
    let mut tally = Tally::new("density of moist air, CIPM-2007");
    for row in table.rows() {
        match row.text("id") {
            "OIML-20" => {
                let computed = cipm_2007::density(row.input("t_C"), row.input("p_Pa"), row.input("h"));
                tally.row_within(row, computed, 2e-4 * row.value());
            }
            "CIPM-R" => tally.row(row, cipm_2007::MOLAR_MASS_OF_AIR / cipm_2007::GAS_CONSTANT),
            "CIPM-C" => tally.row(row, cipm_2007::MOLAR_MASS_BY_CARBON_DIOXIDE / cipm_2007::GAS_CONSTANT),
            "CIPM-M" => tally.row(row, 1.0 - cipm_2007::MOLAR_MASS_OF_WATER / cipm_2007::MOLAR_MASS_OF_AIR),
            "CIPM-A" => tally.row(row, sum(&|mass| mass) / sum(&|_| 1.0)),
            id => panic!("{id}"),
        }
    }
    tally.finish(5);
}

/// What publications differ from one another, and that what is claimed of it is neither too little nor more than twice too much.
#[test]
fn publications_beside_each_other() {
    let mut wrong = 0;
    for row in comparisons() {
        let share = row.largest.abs() / row.bound;
        println!("{row}; claimed {:e}", row.bound);
        if !(0.5..=1.0).contains(&share) {
            wrong += 1;
            println!("  not within half to all of what is claimed: {share}");
        }
    }
    assert_eq!(wrong, 0, "claims that do not hold, or are stale");
}

/// The ideal gas saturates by Hyland and Wexler 1983: their equations here, in a text of their own, to rounding.
#[test]
fn ideal_gas_saturates_by_hyland_wexler() {
    let basis: Basis = Basis::ideal_gas(Pressure::from_kilopascals(101.325));
    let dry = HumidityRatio::from_kilograms_per_kilogram(0.0);
    let mut tally = Tally::new("ideal gas, Hyland-Wexler 1983");
    for celsius in (-80..=150).filter(|&celsius| celsius != 0) {
        let t = f64::from(celsius);
        let air = MoistAir::from_dry_bulb(Temperature::from_celsius(t), dry, basis).unwrap();
        let (text, phase): (fn(f64) -> f64, _) = if celsius < 0 {
            (saturation::hyland_wexler_over_ice, "over ice")
        } else {
            (saturation::hyland_wexler_over_liquid, "over liquid")
        };
        let expected = text(t + 273.15);
        let computed = air.saturation_pressure().unwrap().pascals();
        tally.within(phase, &celsius.to_string(), computed, expected, 1e-13 * expected);
    }
    tally.finish(230);
}
