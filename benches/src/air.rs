//! Rows of air as a building's log holds them. Invented, and always the same.

use moistair_core::Quantity;

/// The full state: what is computed of each row, in the order of the outputs.
pub const FULL_STATE: [Quantity; 8] = [
    Quantity::VaporPressure,
    Quantity::HumidityRatio,
    Quantity::SpecificEnthalpy,
    Quantity::SpecificVolume,
    Quantity::DewPoint,
    Quantity::WetBulb,
    Quantity::DegreeOfSaturation,
    Quantity::Density,
];

/// A column for each property of the full state.
pub type Outputs = [Vec<f64>; FULL_STATE.len()];

/// Input columns.
pub struct Rows {
    /// °C
    pub dry_bulb: Vec<f64>,
    /// Fraction.
    pub relative_humidity: Vec<f64>,
    /// Pa
    pub pressure: Vec<f64>,
}

/// Splitmix64: Steele, Lea & Flood 2014 (constants from memory).
struct Sequence(u64);

impl Sequence {
    fn between(&mut self, low: f64, high: f64) -> f64 {
        self.0 = self.0.wrapping_add(0x9e3779b97f4a7c15);
        let z = (self.0 ^ (self.0 >> 30)).wrapping_mul(0xbf58476d1ce4e5b9);
        let z = (z ^ (z >> 27)).wrapping_mul(0x94d049bb133111eb);
        low + (high - low) * ((z ^ (z >> 31)) >> 11) as f64 / (1_u64 << 53) as f64
    }
}

/// Hours of a year in an order without pattern, so that few rows cover all seasons; by turns outdoor, supply and room air. A fifth of
/// the outdoor hours is below freezing.
pub fn rows(count: usize) -> Rows {
    let mut sequence = Sequence(0x6d6f_6973_7461_6972);
    let mut rows = Rows { dry_bulb: vec![], relative_humidity: vec![], pressure: vec![] };
    for i in 0..count {
        let hour = (i * 3_947 % 8_760) as f64;
        let (season, day) = (triangle(hour / 8_760.0), triangle(hour / 24.0));
        let (dry_bulb, relative_humidity) = match i % 3 {
            0 => {
                let dry_bulb = -8.0 + 30.0 * season + (3.0 + 6.0 * season) * day + sequence.between(-6.0, 6.0);
                (dry_bulb, 0.9 - 0.45 * day + sequence.between(-0.15, 0.1))
            }
            1 => (sequence.between(12.0, 18.0), 0.95 - 0.6 * (1.0 - season) * sequence.between(0.5, 1.0)),
            _ => {
                (21.0 + 4.0 * season + sequence.between(-1.0, 1.0), 0.25 + 0.3 * season + sequence.between(-0.05, 0.05))
            }
        };
        rows.dry_bulb.push(dry_bulb);
        rows.relative_humidity.push(relative_humidity);
        rows.pressure.push(sequence.between(96_000.0, 102_500.0));
    }
    rows
}

/// 0 at whole numbers, 1 between them.
fn triangle(x: f64) -> f64 {
    1.0 - (2.0 * (x - x.floor()) - 1.0).abs()
}

/// Columns to write to.
pub fn outputs(count: usize) -> Outputs {
    std::array::from_fn(|_| vec![f64::NAN; count])
}

/// Largest difference in a column: of a temperature in K, otherwise relative. NaN if a value is.
pub fn difference(quantity: Quantity, ours: &[f64], theirs: &[f64]) -> f64 {
    let scale = |value: f64| if quantity.unit() == "°C" { 1.0 } else { value.abs() };
    let differences = ours.iter().zip(theirs).map(|(a, b)| (a - b).abs() / scale(*a));
    differences.fold(0.0, |most, next| if next > most || next.is_nan() { next } else { most })
}
