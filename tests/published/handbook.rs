//! Tables, examples and chart readings of ASHRAE Fundamentals 2021 (SI), chapter 1.

use moistair_core::*;
use moistair_tests::checks::{Row, Table, Tally, half_of_last_decimal};

const FORMULATIONS: [Formulation; 2] = [Formulation::RealGas, Formulation::IdealGas];

fn at_sea_level(formulation: Formulation) -> Basis {
    Basis::new(Pressure::from_kilopascals(101.325), formulation)
}

fn air<P: SecondProperty<f64>>(celsius: f64, second: P, basis: Basis) -> MoistAir {
    MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), second, basis).unwrap()
}

/// Table 2, moist air at 101.325 kPa, heat capacities per mass of moist air. It stands on the RP-1485 basis: air dissolved in
/// the water, saturation by R7-97 and R14-08, molar mass of dry air 28.966; the real gas here on G8-10, without dissolved air.
/// So W_s may differ by 1.5e-4, h_s by 2.1e-4 of the vapor's part, c_p of saturated air by 0.3 % (90 °C), dry air and volumes by
/// the last digit: h_da by 1.8 units of it, at 90 °C.
#[test]
fn table_2_moist_air() {
    let table = Table::read(include_str!("handbook_table2_moist_air.csv"));
    let mut tally = Tally::new("handbook Table 2");
    for row in table.rows() {
        let celsius = row.number("t_C");
        let dry = air(celsius, HumidityRatio::from_grams_per_kilogram(0.0), at_sea_level(Formulation::RealGas));
        let saturated = air(celsius, DegreeOfSaturation::from_fraction(1.0), at_sea_level(Formulation::RealGas));
        let unit = |column| 2.0 * half_of_last_decimal(row.text(column));
        let mut compare = |column, computed, tolerance| {
            tally.within(column, row.text("t_C"), computed, row.number(column), tolerance);
        };
        let w = row.number("Ws_kg_kg");
        compare("Ws_kg_kg", saturated.humidity_ratio().kilograms_per_kilogram(), 0.5 * unit("Ws_kg_kg") + 1.5e-4 * w);
        compare("v_da_m3_kg", dry.specific_volume().cubic_meters_per_kilogram(), unit("v_da_m3_kg"));
        compare("v_s_m3_kgda", saturated.specific_volume().cubic_meters_per_kilogram(), unit("v_s_m3_kgda"));
        compare("h_da_kJ_kg", dry.specific_enthalpy().kilojoules_per_kilogram(), 1.8 * unit("h_da_kJ_kg"));
        let tolerance = 1.8 * unit("h_s_kJ_kgda") + 2.1e-4 * 2_501.0 * w;
        compare("h_s_kJ_kgda", saturated.specific_enthalpy().kilojoules_per_kilogram(), tolerance);
        let cp = |air: MoistAir| {
            air.specific_heat().joules_per_kilogram_kelvin()
                / 1e3
                / (1.0 + air.humidity_ratio().kilograms_per_kilogram())
        };
        let entropy = |air: MoistAir| air.specific_entropy().joules_per_kilogram_kelvin() / 1e3;
        compare("s_da_kJ_kgK", entropy(dry), unit("s_da_kJ_kgK"));
        // As far as the humidity ratio goes, at 9.15 kJ/(kg K) of vapor.
        compare("s_s_kJ_kgdaK", entropy(saturated), unit("s_s_kJ_kgdaK") + 1.5e-4 * 9.15 * w);
        compare("cp_da_kJ_kgK", cp(dry), unit("cp_da_kJ_kgK"));
        compare("cp_s_kJ_kgK", cp(saturated), unit("cp_s_kJ_kgK") + 3e-3 * row.number("cp_s_kJ_kgK"));
    }
    tally.finish(153);
}

/// Table 1, the standard atmosphere. The chapter computes it by its Eq. (3), whose constants are rounded to five digits; the
/// pressure here differs from Eq. (3) by less than 2e-5 to 10 km, and both give the table to its print and that.
#[test]
fn table_1_standard_atmosphere() {
    let table = Table::read(include_str!("handbook_examples.csv"));
    let mut tally = Tally::new("handbook Table 1");
    for row in table.rows().filter(|row| row.text("id").starts_with("ASH-T1-")) {
        let meters = row.input("Z_m");
        let by_equation_3 = 101.325 * (1.0 - 2.25577e-5 * meters).powf(5.2559);
        let computed = Pressure::at_elevation(Length::from_meters(meters)).unwrap().kilopascals();
        tally.within("against Eq. (3)", row.text("id"), computed, by_equation_3, 2e-5 * by_equation_3);
        tally.row_within(row, computed, row.half_unit() + 2e-5 * computed);
    }
    tally.finish(30);
}

/// Half a unit of the last digit, and for what the examples read from the chart what an eye can read there: 0.2 kJ/kg, 0.1 g/kg,
/// 0.5 % of relative humidity, 0.5 K of dew point, 0.001 m³/kg. The charts are of real moist air: the ideal gas holds
/// 0.5 % less vapor at saturation (its enhancement factor is one), which shows in W and h.
fn chart_reading(row: Row<'_>, formulation: Formulation) -> f64 {
    let eye: f64 = match row.text("unit") {
        "g/kg_da" => 0.1,
        "kg/kg_da" => 1e-4,
        "kJ/kg_da" => 0.2,
        "m3/kg_da" => 1e-3,
        "%" | "degC" => 0.5,
        unit => panic!("{unit}"),
    };
    let ideal =
        if formulation == Formulation::IdealGas && ["g/kg_da", "kg/kg_da", "kJ/kg_da"].contains(&row.text("unit")) {
            5e-3
        } else {
            0.0
        };
    eye.max(row.half_unit()) + ideal * row.value()
}

/// What a row of an example asks of a state.
fn read(row: Row<'_>, air: &MoistAir) -> f64 {
    match row.text("unit") {
        "g/kg_da" => air.humidity_ratio().grams_per_kilogram(),
        "kg/kg_da" => air.humidity_ratio().kilograms_per_kilogram(),
        "kJ/kg_da" => air.specific_enthalpy().kilojoules_per_kilogram(),
        "m3/kg_da" => air.specific_volume().cubic_meters_per_kilogram(),
        "%" => air.relative_humidity().unwrap().percent(),
        "degC" => air.dew_point().unwrap().celsius(),
        unit => panic!("{unit}"),
    }
}

/// The states of Examples 1 to 6 (the processes between them are checked in `process/`).
#[test]
fn states_of_the_examples() {
    let table = Table::read(include_str!("handbook_examples.csv"));
    for formulation in FORMULATIONS {
        let basis = at_sea_level(formulation);
        let saturated = |celsius| air(celsius, RelativeHumidity::from_percent(100.0), basis);
        let wet = |celsius, wet_bulb| air(celsius, WetBulb::from_celsius(wet_bulb), basis);
        let half = |celsius| air(celsius, RelativeHumidity::from_percent(50.0), basis);
        let heated = air(40.0, saturated(2.0).humidity_ratio(), basis);
        let states = [
            ("ASH-E1-W", wet(40.0, 20.0)),
            ("ASH-E1-h", wet(40.0, 20.0)),
            ("ASH-E1-td", wet(40.0, 20.0)),
            ("ASH-E1-rh", wet(40.0, 20.0)),
            ("ASH-E1-v", wet(40.0, 20.0)),
            ("ASH-E2-h1", saturated(2.0)),
            ("ASH-E2-W1", saturated(2.0)),
            ("ASH-E2-v1", saturated(2.0)),
            ("ASH-E2-h2", heated),
            ("ASH-E3-h1", half(30.0)),
            ("ASH-E3-W1", half(30.0)),
            ("ASH-E3-v1", half(30.0)),
            ("ASH-E3-h2", saturated(10.0)),
            ("ASH-E3-W2", saturated(10.0)),
            ("ASH-E4-v1", wet(4.0, 2.0)),
            ("ASH-E4-v2", half(25.0)),
            ("ASH-E5-W1", wet(20.0, 8.0)),
            ("ASH-E5-W2", air(21.0, DewPoint::from_celsius(13.0), basis)),
            ("ASH-E6-h2", wet(25.0, 19.0)),
        ];
        let mut tally =
            Tally::new(if formulation == Formulation::RealGas { "examples, real gas" } else { "examples, ideal gas" });
        for (id, state) in states {
            for row in table.rows().filter(|row| row.text("id") == id) {
                println!("{formulation:?} {id} {} {}", row.value(), read(row, &state));
                tally.row_within(row, read(row, &state), chart_reading(row, formulation));
            }
        }
        tally.finish(19);
    }
}

/// The readings that the chapter compares with its charts 1 and 6.
#[test]
fn chart_readings() {
    let table = Table::read(include_str!("handbook_examples.csv"));
    for formulation in FORMULATIONS {
        let mut tally =
            Tally::new(if formulation == Formulation::RealGas { "charts, real gas" } else { "charts, ideal gas" });
        for row in table.rows().filter(|row| row.text("id").starts_with("ASH-C")) {
            let basis = Basis::new(Pressure::from_kilopascals(row.input("p_kPa")), formulation);
            let state = air(row.input("t_db_C"), WetBulb::from_celsius(row.input("t_wb_C")), basis);
            println!("{formulation:?} {} {} {}", row.text("id"), row.value(), read(row, &state));
            tally.row_within(row, read(row, &state), chart_reading(row, formulation));
        }
        tally.finish(8);
    }
}
