//! Moist air, and what air-handling plant does to it: one computing core.
#![no_std]
#![forbid(unsafe_code)]

#[cfg(any(feature = "std", test))]
extern crate std;

mod real;

pub use real::Scalar;
