//! Density of moist air for weighing: Picard, Davis, Gläser and Fujii, Metrologia 45 (2008) 149 (CIPM-2007). All figures from memory.
//!
//! Range: 600 to 1100 hPa, 15 to 27 °C; relative standard uncertainty 22e-6.

/// Molar mass of dry air with 0.4 mmol/mol of carbon dioxide, kg/mol.
pub const MOLAR_MASS_OF_AIR: f64 = 28.96546e-3;
/// What a mole of carbon dioxide in place of oxygen adds, kg/mol.
pub const MOLAR_MASS_BY_CARBON_DIOXIDE: f64 = 12.011e-3;
/// Molar mass of water, kg/mol.
pub const MOLAR_MASS_OF_WATER: f64 = 18.01528e-3;
/// R, J/(mol K): CODATA 2006.
pub const GAS_CONSTANT: f64 = 8.314472;

/// Saturation pressure over water, Pa.
#[must_use]
pub fn saturation_pressure(celsius: f64) -> f64 {
    let t = celsius + 273.15;
    (1.2378847e-5 * t * t - 1.9121316e-2 * t + 33.93711047 - 6.3431645e3 / t).exp()
}

/// Enhancement factor.
#[must_use]
pub fn enhancement_factor(celsius: f64, pascals: f64) -> f64 {
    1.00062 + 3.14e-8 * pascals + 5.6e-7 * celsius * celsius
}

/// Mole fraction of water at a relative humidity.
#[must_use]
pub fn mole_fraction(celsius: f64, pascals: f64, relative_humidity: f64) -> f64 {
    relative_humidity * enhancement_factor(celsius, pascals) * saturation_pressure(celsius) / pascals
}

/// Compressibility factor.
#[must_use]
pub fn compressibility_factor(celsius: f64, pascals: f64, mole_fraction: f64) -> f64 {
    let (t, x, p_over_t) = (celsius, mole_fraction, pascals / (celsius + 273.15));
    let second = 1.58123e-6
        + t * (-2.9331e-8 + t * 1.1043e-10)
        + (5.707e-6 - 2.051e-8 * t) * x
        + (1.9898e-4 - 2.376e-6 * t) * x * x;
    1.0 - p_over_t * second + p_over_t * p_over_t * (1.83e-11 - 0.765e-8 * x * x)
}

/// Density at a mole fraction of water, kg/m³, with 0.4 mmol/mol of carbon dioxide.
#[must_use]
pub fn density_at_mole_fraction(celsius: f64, pascals: f64, mole_fraction: f64) -> f64 {
    let z = compressibility_factor(celsius, pascals, mole_fraction);
    let lighter = 1.0 - mole_fraction * (1.0 - MOLAR_MASS_OF_WATER / MOLAR_MASS_OF_AIR);
    pascals * MOLAR_MASS_OF_AIR / (z * GAS_CONSTANT * (celsius + 273.15)) * lighter
}

/// Density at a relative humidity, kg/m³.
#[must_use]
pub fn density(celsius: f64, pascals: f64, relative_humidity: f64) -> f64 {
    density_at_mole_fraction(celsius, pascals, mole_fraction(celsius, pascals, relative_humidity))
}
