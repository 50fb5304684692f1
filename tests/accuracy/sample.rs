//! Where it is measured: points of low discrepancy over ranges of temperature, pressure and humidity.

use moistair_core::*;

/// A box of states.
#[derive(Clone, Copy, Debug)]
pub struct Region {
    /// Its name on the page.
    pub name: &'static str,
    /// °C
    pub celsius: (f64, f64),
    /// Pa
    pub pascals: (f64, f64),
}

/// Where the default formulation has its budget.
pub const EVERYDAY: Region =
    Region { name: "−80 to 100 °C, 40 to 120 kPa", celsius: (-80.0, 100.0), pascals: (40e3, 120e3) };
/// All that the default formulation takes.
pub const WHOLE: Region =
    Region { name: "−80 to 150 °C, 20 to 1100 kPa", celsius: (-80.0, 150.0), pascals: (20e3, 1.1e6) };
/// Where single precision has its budget.
pub const ROOMS: Region =
    Region { name: "−40 to 60 °C, 70 to 110 kPa", celsius: (-40.0, 60.0), pascals: (70e3, 110e3) };

/// Dry bulb [°C], pressure [Pa], and how much of the vapor that the air can hold it has.
#[derive(Clone, Copy, Debug)]
pub struct Point {
    /// °C
    pub celsius: f64,
    /// Pa
    pub pascals: f64,
    /// 0 to 1
    pub share: f64,
}

impl Region {
    /// The points of the region: Halton 1960 in bases 2, 3 and 5, temperature evenly, pressure evenly in its logarithm.
    pub fn point(&self, index: usize) -> Point {
        let between = |(low, high): (f64, f64), share: f64| low + (high - low) * share;
        let ln = (self.pascals.0.ln(), self.pascals.1.ln());
        Point {
            celsius: between(self.celsius, radical_inverse(index, 2)),
            pascals: between(ln, radical_inverse(index, 3)).exp().clamp(self.pascals.0, self.pascals.1),
            share: radical_inverse(index, 5),
        }
    }
}

/// The digits of a number in a base, mirrored at the point: van der Corput's sequence.
fn radical_inverse(index: usize, base: usize) -> f64 {
    let (mut rest, mut value, mut digit) = (index + 1, 0.0, 1.0);
    while rest > 0 {
        digit /= base as f64;
        value += (rest % base) as f64 * digit;
        rest /= base;
    }
    value
}

impl Point {
    /// The basis of the point on a formulation.
    pub fn basis(&self, formulation: Formulation) -> Basis {
        Basis::new(Pressure::from_pascals(self.pascals), formulation)
    }

    /// The dry bulb.
    pub fn dry_bulb(&self) -> Temperature {
        Temperature::from_celsius(self.celsius)
    }

    /// The share of what the air can hold, saturated over liquid (over ice where no liquid lasts), as a humidity ratio.
    pub fn humidity_ratio(&self, formulation: Formulation) -> HumidityRatio {
        let (most, basis) = (Quantity::HumidityRatio.limits().1, self.basis(formulation));
        let saturated = MoistAir::from_dry_bulb(self.dry_bulb(), RelativeHumidityOverLiquid::from_fraction(1.0), basis)
            .or_else(|_| MoistAir::from_dry_bulb(self.dry_bulb(), RelativeHumidity::from_fraction(1.0), basis));
        let limit = saturated.map_or(most, |air| air.humidity_ratio().kilograms_per_kilogram().min(most));
        HumidityRatio::from_kilograms_per_kilogram(limit * self.share)
    }
}

impl std::fmt::Display for Point {
    fn fmt(&self, f: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        let (celsius, kilopascals, percent) = (self.celsius, self.pascals / 1e3, 100.0 * self.share);
        write!(f, "{celsius:.1} °C, {kilopascals:.1} kPa, {percent:.0} %")
    }
}
