//! What air-handling plant does to moist air.
//!
//! Results are estimates for engineering, not a safety function. Wet surfaces grow mould, water systems spread Legionella, coils freeze, steam
//! burns: local codes and licensed practice govern.

pub mod coil;
pub mod compression;
pub mod desiccant;
pub mod economizer;
pub mod evaporative;
pub mod humidify;
pub mod mixing;
pub mod outdoor_air;
pub mod reheat;
pub mod room;
pub mod sensible;
pub mod sequence;
pub mod stream;
pub mod tower;
pub mod tower_sizing;
pub mod water_coil;

pub use coil::*;
pub use compression::*;
pub use desiccant::*;
pub use economizer::*;
pub use evaporative::*;
pub use humidify::*;
pub use mixing::*;
pub use outdoor_air::*;
pub use reheat::*;
pub use room::*;
pub use sensible::*;
pub use sequence::*;
pub use stream::*;
pub use tower::*;
pub use tower_sizing::*;
pub use water_coil::*;

use moistair_core::{HumidityRatio, MassFlow, SpecificEnthalpy, Temperature};

fn finite<const N: usize>(numbers: [f64; N]) -> bool {
    numbers.iter().all(|number| number.is_finite())
}

fn celsius(value: f64) -> Temperature {
    Temperature::from_celsius(value)
}

fn mass_flow(value: f64) -> MassFlow {
    MassFlow::from_kilograms_per_second(value)
}

fn ratio(value: f64) -> HumidityRatio {
    HumidityRatio::from_kilograms_per_kilogram(value)
}

fn enthalpy(value: f64) -> SpecificEnthalpy {
    SpecificEnthalpy::from_joules_per_kilogram(value)
}
