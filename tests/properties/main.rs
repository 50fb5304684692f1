//! Laws that states keep over the whole declared domain.
#![allow(clippy::disallowed_methods, reason = "tests may use the platform's functions")]

mod errors;
mod hostile;
mod identities;
mod order;
mod pairs;
mod psychrometer;
mod round_trip;
mod support;
