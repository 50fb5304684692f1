//! Heating and cooling at constant humidity ratio.

use moistair_core::HeatFlow;
use moistair_core::process::sensible::{self, Sensible};

use super::celsius;
use super::stream::{moistair_exchange, moistair_stream};
use crate::memory::{Answer, answer, read};
use crate::status::moistair_error;

/// What a heater or a dry cooler did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_sensible {
    /// The air that leaves.
    pub leaving: moistair_stream,
    /// Heat into the air, no water.
    pub exchange: moistair_exchange,
}

impl From<Sensible> for moistair_sensible {
    fn from(done: Sensible) -> Self {
        Self { leaving: done.leaving.into(), exchange: done.exchange.into() }
    }
}

impl Answer for moistair_sensible {
    fn is_finite(&self) -> bool {
        self.leaving.is_finite() && self.exchange.is_finite()
    }
}

/// Heats or cools to a temperature at constant humidity ratio.
///
/// entering: the stream that enters; leaving_temperature: [°C]; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (saturation would be crossed: use a coil).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_sensible_to_temperature(
    entering: *const moistair_stream,
    leaving_temperature: f64,
    done: *mut moistair_sensible,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(sensible::to_temperature(&unsafe { read(entering) }?.to_core()?, celsius(leaving_temperature))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Heats or cools by a heat flow at constant humidity ratio.
///
/// entering: the stream that enters; heat: [W], positive into the air; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207 (heat into no air), 301 (saturation or the range of states would be crossed).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_sensible_with_heat(
    entering: *const moistair_stream,
    heat: f64,
    done: *mut moistair_sensible,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(sensible::with_heat(&unsafe { read(entering) }?.to_core()?, HeatFlow::from_watts(heat))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

const _: () = assert!(size_of::<moistair_sensible>() == 136);
