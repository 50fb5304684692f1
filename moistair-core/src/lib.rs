//! Moist air, and what air-handling plant does to it: one computing core.
#![no_std]
#![forbid(unsafe_code)]

#[cfg(any(feature = "std", test))]
extern crate std;

pub mod account;
mod atmosphere;
mod basis;
mod bounds;
#[cfg(test)]
mod checks;
pub mod columns;
mod error;
mod mixture;
pub mod process;
mod quantity;
mod real;
mod saturation;
pub mod sequence;
pub mod signal;
mod solve;
mod state;
mod substance;

pub use basis::{Basis, Formulation};
pub use bounds::{PROPERTY_COUNT, Quantity};
pub use error::{Error, NoValue, Undetermined};
pub use quantity::*;
pub use real::Scalar;
pub use state::{
    AirWithCondensate, Bulb, Freezing, MoistAir, PropertyDerivatives, Psychrometer, PsychrometerReading,
    SaturationPoint, SecondProperty, liquid_water_enthalpy, saturation_point_after, saturation_temperature_after,
};

/// Changes when any result changes in any bit; the change log then states by how much.
pub const NUMERICS_VERSION: u32 = 2;
