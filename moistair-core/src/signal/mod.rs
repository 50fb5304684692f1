//! Check and repair one measured signal, sample by sample.
//!
//! A [`Channel`] says what is known of a signal before the first sample, a [`ChannelState`] remembers what the samples
//! have shown, and [`Channel::check`] turns each raw reading into a value in the unit of the core with a [`Quality`]
//! and a [`Reason`]. Every raw unit is converted here and nowhere else.
//!
//! Structures hold numbers only, their layout is that of C, and zero bytes are a fresh state. No input panics.

mod channel;
mod check;
mod clock;
pub(crate) mod coded;
mod reason;
mod unit;

#[cfg(test)]
mod tests;

pub use channel::{
    Channel, GAP_INTERVALS, HIGHEST_RELATIVE_HUMIDITY, SLIP_FLOOR, SLIP_HIGHEST_FRACTION, SLIP_REACH, SLIP_SAMPLES,
    SLIP_SECONDS,
};
pub use check::{ChannelState, Checked};
pub use clock::{Clock, LONGEST_TIME, RESTART_SAMPLES, Tick};
pub use reason::{Quality, Reason};
pub use unit::{Kind, Unit};

pub(crate) use clock::{microseconds, seconds};
