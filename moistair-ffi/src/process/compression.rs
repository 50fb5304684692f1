//! Compressed air.

use moistair_core::Pressure;
use moistair_core::process::compression::{self, Compressed};

use super::celsius;
use super::stream::{moistair_exchange, moistair_wet_stream};
use crate::memory::{Answer, answer, read};
use crate::status::moistair_error;

/// Air that was brought to another pressure and temperature.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_compressed {
    /// Air and all its water at the new pressure and temperature, before a separator; after a perfect one the stream is
    /// {leaving.mixture.air, leaving.dry_air_flow}.
    pub leaving: moistair_wet_stream,
    /// Work of compression less the heat of cooling, into the air; no water.
    pub exchange: moistair_exchange,
    /// Liquid and ice in the leaving air, what a perfect separator drains [kg/s].
    pub condensate: f64,
}

impl From<Compressed> for moistair_compressed {
    fn from(done: Compressed) -> Self {
        Self {
            leaving: done.leaving.into(),
            exchange: done.exchange.into(),
            condensate: done.condensate.kilograms_per_second(),
        }
    }
}

impl Answer for moistair_compressed {
    fn is_finite(&self) -> bool {
        self.leaving.is_finite() && self.exchange.is_finite() && self.condensate.is_finite()
    }
}

/// Brings air to a pressure and temperature, by whatever machine (compressor with aftercooler, dryer, expansion), and lets its water come to
/// equilibrium there; below the melting temperature what condenses is ice. Pressures are absolute. Vessels under pressure can burst, condensate
/// freezes: codes for pressure equipment and licensed practice govern, this is no safety function.
///
/// entering: the stream that enters; pressure: absolute [Pa]; leaving_temperature: [°C]; done: output; error: may
/// be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_compression_to_pressure(
    entering: *const moistair_wet_stream,
    pressure: f64,
    leaving_temperature: f64,
    done: *mut moistair_compressed,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let entering = unsafe { read(entering) }?.to_core()?;
        Ok(compression::to_pressure(&entering, Pressure::from_pascals(pressure), celsius(leaving_temperature))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

const _: () = assert!(size_of::<moistair_compressed>() == 176);
