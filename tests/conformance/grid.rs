//! The seeded grid: states all over the declared domain, by every second property, and slips of every kind.

use std::fs;
use std::path::PathBuf;

use moistair_core::{Basis, Formulation, HumidityRatio, MoistAir, PROPERTY_COUNT, Pressure, Quantity, Temperature};
use moistair_tests::toolchain::workshop;

/// Rows of the grid.
pub const ROWS: usize = 100_000;
/// Columns of results: a status and every property.
pub const RESULTS: usize = 1 + PROPERTY_COUNT as usize;

const SECOND: [Quantity; 16] = [
    Quantity::RelativeHumidity,
    Quantity::RelativeHumidityOverLiquid,
    Quantity::WetBulb,
    Quantity::WetBulbOverLiquid,
    Quantity::WetBulbOverIce,
    Quantity::DewPoint,
    Quantity::FrostPoint,
    Quantity::HumidityRatio,
    Quantity::SpecificHumidity,
    Quantity::AbsoluteHumidity,
    Quantity::VaporPressure,
    Quantity::WaterMoleFraction,
    Quantity::DegreeOfSaturation,
    Quantity::SpecificEnthalpy,
    Quantity::SpecificVolume,
    Quantity::Density,
];

/// One row of input: dry bulb, second property, pressure, and two selectors.
#[derive(Clone, Copy, Debug)]
pub struct Row {
    pub dry_bulb: f64,
    pub value: f64,
    pub pressure: f64,
    pub quantity: Quantity,
    pub formulation: Formulation,
}

/// Steele, Lea & Flood 2014 (splitmix64), constants from memory: any fixed sequence would do.
struct Sequence(u64);

impl Sequence {
    fn bits(&mut self) -> u64 {
        self.0 = self.0.wrapping_add(0x9e3779b97f4a7c15);
        let mut z = self.0;
        z = (z ^ (z >> 30)).wrapping_mul(0xbf58476d1ce4e5b9);
        z = (z ^ (z >> 27)).wrapping_mul(0x94d049bb133111eb);
        z ^ (z >> 31)
    }

    fn unit(&mut self) -> f64 {
        (self.bits() >> 11) as f64 / (1u64 << 53) as f64
    }

    fn between(&mut self, low: f64, high: f64) -> f64 {
        low + (high - low) * self.unit()
    }
}

/// The grid, always the same. Its inputs use no elementary function, so that they are the same on every platform.
pub fn rows() -> Vec<Row> {
    let mut sequence = Sequence(0x6d6f_6973_7461_6972);
    (0..ROWS).map(|i| row(i, &mut sequence)).collect()
}

fn row(i: usize, sequence: &mut Sequence) -> Row {
    let quantity = SECOND[i % SECOND.len()];
    // Blocks of one formulation, so that the column calls get long runs. The slow one has an eighth.
    let formulation = match (i / SECOND.len()) % 8 {
        7 => Formulation::Helmholtz,
        1 | 3 | 5 => Formulation::IdealGas,
        _ => Formulation::RealGas,
    };
    let within = |sequence: &mut Sequence, quantity| {
        let (low, high) = formulation.limits(quantity);
        sequence.between(low, high)
    };
    // Half of the rows where people live, half anywhere.
    let everyday = sequence.unit() < 0.5;
    let (dry_bulb, pressure) = if everyday {
        (sequence.between(-30.0, 50.0), sequence.between(70e3, 110e3))
    } else {
        (within(sequence, Quantity::DryBulb), within(sequence, Quantity::Pressure))
    };
    let slip = sequence.unit();
    let wetness = sequence.unit();
    let value = if slip < 0.02 {
        f64::from_bits(sequence.bits())
    } else {
        let basis = Basis::new(Pressure::from_pascals(pressure), formulation);
        let at = |ratio| {
            MoistAir::from_dry_bulb(
                Temperature::from_celsius(dry_bulb),
                HumidityRatio::from_kilograms_per_kilogram(ratio),
                basis,
            )
        };
        // A fraction of what the air can hold, a little beyond now and then.
        let most = match at(10.0) {
            Ok(_) => 10.0,
            Err(error) => error.value_and_limits().map_or(0.0, |(_, _, max)| max),
        };
        let state = at(most * wetness);
        state.and_then(|air| air.value(quantity)).unwrap_or(wetness)
    };
    let value = if (0.02..0.05).contains(&slip) { value * 1.1 } else { value };
    let dry_bulb = if (0.05..0.06).contains(&slip) { f64::from_bits(sequence.bits()) } else { dry_bulb };
    let pressure = if (0.06..0.07).contains(&slip) { f64::from_bits(sequence.bits()) } else { pressure };
    Row { dry_bulb, value, pressure, quantity, formulation }
}

/// Status and properties of one row by the scalar calls of the core, in the bits of `f64`.
pub fn evaluate(row: &Row) -> [u64; RESULTS] {
    let mut results = [f64::NAN.to_bits(); RESULTS];
    let basis = Basis::new(Pressure::from_pascals(row.pressure), row.formulation);
    match MoistAir::from_dry_bulb_and(Temperature::from_celsius(row.dry_bulb), row.quantity, row.value, basis) {
        Err(error) => results[0] = f64::from(error.code()).to_bits(),
        Ok(air) => {
            results[0] = 0f64.to_bits();
            let properties = Quantity::ALL.iter().copied().filter(|quantity| quantity.is_property());
            air.values(properties, |quantity, value: Result<f64, _>| {
                results[1 + quantity.code() as usize] = value.unwrap_or(f64::NAN).to_bits();
            });
        }
    }
    results
}

/// Everything the scalar core says about the grid, as little-endian bytes.
pub fn expected() -> &'static [u8] {
    static BYTES: std::sync::OnceLock<Vec<u8>> = std::sync::OnceLock::new();
    BYTES.get_or_init(|| rows().iter().flat_map(evaluate).flat_map(u64::to_le_bytes).collect())
}

/// The inputs as a file of little-endian `f64`: dry bulb, value, pressure, selector, formulation per row.
pub fn write_inputs() -> PathBuf {
    let path = workshop().join("grid.bin");
    let numbers = rows().into_iter().flat_map(|row| {
        let selectors = [f64::from(row.quantity.code()), f64::from(row.formulation.code())];
        [row.dry_bulb, row.value, row.pressure, selectors[0], selectors[1]]
    });
    let bytes: Vec<u8> = numbers.flat_map(|number| number.to_bits().to_le_bytes()).collect();
    fs::write(&path, bytes).unwrap();
    path
}

/// Fails with the first rows that differ.
pub fn compare(face: &str, bytes: &[u8]) {
    let expected = expected();
    assert_eq!(bytes.len(), expected.len(), "{face}: as many results as the core gives");
    let width = RESULTS * 8;
    let rows = rows();
    let differing: Vec<_> =
        (0..ROWS).filter(|i| bytes[i * width..][..width] != expected[i * width..][..width]).collect();
    let shown: Vec<_> = differing
        .iter()
        .take(3)
        .map(|&i| {
            let words = |bytes: &[u8]| -> Vec<f64> {
                bytes[i * width..][..width].chunks(8).map(|word| f64::from_le_bytes(word.try_into().unwrap())).collect()
            };
            format!("row {i} {:?}\n  core {:?}\n  {face} {:?}", rows[i], words(expected), words(bytes))
        })
        .collect();
    assert!(differing.is_empty(), "{} of {ROWS} rows differ\n{}", differing.len(), shown.join("\n"));
    println!("{face}: {ROWS} rows, {} values, the same bits", ROWS * RESULTS);
}

/// FNV-1a, 64 bits: Fowler, Noll & Vo, constants from memory.
pub fn digest(bytes: &[u8]) -> u64 {
    bytes.iter().fold(0xcbf29ce484222325, |hash, byte| (hash ^ u64::from(*byte)).wrapping_mul(0x100000001b3))
}
