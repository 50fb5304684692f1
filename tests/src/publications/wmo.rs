//! Humidity of the weather services: WMO-No. 8 (Guide to Instruments and Methods of Observation), part I, chapter 4, annex 4.B.
//! All figures from memory; no printed value is at hand: how near they come to IAPWS-95 is what checks them.

/// Saturation pressure over liquid water, Pa; published for −45 to 60 °C.
#[must_use]
pub fn saturation_pressure_over_liquid(celsius: f64) -> f64 {
    611.2 * (17.62 * celsius / (243.12 + celsius)).exp()
}

/// Saturation pressure over ice, Pa; published for −65 to 0 °C.
#[must_use]
pub fn saturation_pressure_over_ice(celsius: f64) -> f64 {
    611.2 * (22.46 * celsius / (272.62 + celsius)).exp()
}

/// Enhancement factor, taken as one of pressure alone.
#[must_use]
pub fn enhancement_factor(pascals: f64) -> f64 {
    let hectopascals = pascals / 100.0;
    1.0016 + 3.15e-6 * hectopascals - 0.074 / hectopascals
}
