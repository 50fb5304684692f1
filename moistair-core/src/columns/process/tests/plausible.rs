//! Numbers for the inputs of a process by their names and units. The tests of the faces include this file as well.

use crate::checks::Random;

/// A number that may stand in a field of a process: most rows are feasible, and every kind of refusal occurs.
pub fn plausible(process: &str, name: &str, unit: &str, row: usize, random: &mut Random) -> f64 {
    let last = name.rsplit('.').next().unwrap();
    if row % 8 == 7 && random.between(0.0, 4.0) < 1.0 {
        return [f64::NAN, -1.0, 1e9, 0.5][row / 8 % 4];
    }
    let leaves_tower = name.starts_with("leaving") && process.starts_with("tower");
    match (last, unit) {
        ("given" | "wanted", unit) if unit.starts_with("choice: code") => [21.0, 22.0][row % 2],
        ("humidity_quantity", _) => 12.0,
        ("quantity", _) => [0.0, 2.0, 7.0, 0.0][row % 4],
        (_, unit) if unit.starts_with("choice") => [0.0, 0.0, 1.0, 2.0][row % 4],
        ("dry_bulb", _) if leaves_tower => random.between(30.0, 35.0),
        ("humidity_ratio", _) if leaves_tower => random.between(0.02, 0.025),
        ("dry_bulb", _) if name.starts_with("leaving") => random.between(7.0, 13.0),
        ("humidity_ratio", _) if name.starts_with("leaving") => random.between(0.004, 0.006),
        ("value", _) if name.contains("humidity") => random.between(0.2, 0.8),
        ("standard_uncertainty", _) => random.between(0.0, 0.1),
        ("dry_bulb" | "value", _) => random.between(15.0, 40.0),
        ("ice", _) => [0.0, 0.0, 0.0, 0.001][row % 4],
        ("hot_water", _) => random.between(36.0, 45.0),
        ("cold_water", _) => random.between(30.0, 36.0),
        ("entering_water" | "given", "°C") => random.between(5.0, 15.0),
        ("specific_enthalpy", _) => random.between(2e4, 8e4),
        ("slope", _) => random.between(3e6, 2e7),
        ("moisture", _) => random.between(0.0, 0.004),
        ("steam_enthalpy", _) => random.between(2.6e6, 2.8e6),
        ("steam_temperature", _) => random.between(110.0, 190.0),
        ("pump_heat", _) => random.between(0.0, 500.0),
        ("circulating", _) => 1500.0,
        ("make_up", _) => random.between(100.0, 1500.0),
        (_, "kg" | "mg/kg") => random.between(100.0, 1e4),
        ("drift_fraction", _) => random.between(0.0, 0.01),
        ("cycles_of_concentration", _) => random.between(1.0, 5.0),
        ("coefficient", "1/K") => random.between(5e-4, 1e-3),
        ("first_water_to_air", _) => random.between(0.5, 1.0),
        ("second_water_to_air", _) => random.between(1.0, 2.0),
        ("first_number", _) => random.between(1.5, 2.0),
        ("second_number", _) => random.between(1.0, 1.5),
        ("rows", _) => (row % 8) as f64,
        ("total_flow", _) => random.between(2.0, 8.0),
        ("blowdown" | "make_up_flow" | "drift" | "steam_flow", _) => random.between(0.0, 0.02),
        (_, "°C") => random.between(5.0, 40.0),
        (_, "K") => random.between(0.0, 10.0),
        (_, "kg/kg") => random.between(0.0, 0.012),
        (_, "Pa") => [101_325.0, 95_000.0, 101_325.0][row % 3],
        (_, "kg/s" | "m³/s" | "m" | "kg/m³") => random.between(0.9, 1.9),
        (_, "W") => random.between(-5e3, 2e4),
        (_, "J/(kg K)") => random.between(3500.0, 4200.0),
        (_, "W/K") => random.between(1e3, 1e4),
        (_, "1") => random.between(0.0, 1.0),
        (_, "s") => random.between(0.0, 1e4),
        (_, unit) => panic!("a unit that this test does not know: {unit}"),
    }
}
