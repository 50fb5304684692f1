//! Moist air, and what air-handling plant does to it: one computing core.
#![no_std]
#![forbid(unsafe_code)]

#[cfg(any(feature = "std", test))]
extern crate std;

pub mod account;
mod atmosphere;
mod basis;
mod bounds;
mod error;
mod mixture;
mod quantity;
mod real;
mod saturation;
pub mod signal;
mod state;
mod substance;

pub use basis::{Basis, Formulation};
pub use bounds::{PROPERTY_COUNT, Quantity};
pub use error::{Error, NoValue};
pub use quantity::*;
pub use real::Scalar;
pub use saturation::Surface;
pub use state::{MoistAir, SecondProperty};
