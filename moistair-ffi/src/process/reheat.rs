//! Cooling to shed water, then heating back.

use moistair_core::RelativeHumidity;
use moistair_core::columns::NAN;
use moistair_core::process::reheat::{self, Reheat};

use super::coil::moistair_cooling;
use super::sensible::moistair_sensible;
use super::stream::moistair_stream;
use crate::memory::{Answer, answer, read};
use crate::state::moistair_state;
use crate::status::moistair_error;

/// What a coil and the heater behind it did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_reheat {
    /// The coil.
    pub cooling: moistair_cooling,
    /// The heater.
    pub heating: moistair_sensible,
    /// Heat of the heater over the cooling load [1]; NaN without a load.
    pub reheat_fraction: f64,
}

impl From<Reheat> for moistair_reheat {
    fn from(done: Reheat) -> Self {
        let reheat_fraction = done.reheat_fraction().unwrap_or(NAN);
        Self { cooling: done.cooling.into(), heating: done.heating.into(), reheat_fraction }
    }
}

impl Answer for moistair_reheat {
    fn is_finite(&self) -> bool {
        self.cooling.is_finite() && self.heating.is_finite()
    }
}

/// Reaches a state by cooling to its humidity ratio, then heating. Codes restrict simultaneous heating and cooling.
///
/// entering: the stream that enters; target: the state to reach; coil_leaving_relative_humidity: [1] of the air between coil and heater,
/// 0.2 to 1; condensate: where the condensate temperature comes from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150,
/// read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the target is moister, or cooler than the coil would leave).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_reheat_to_state(
    entering: *const moistair_stream,
    target: *const moistair_state,
    coil_leaving_relative_humidity: f64,
    condensate: i32,
    condensate_temperature: f64,
    done: *mut moistair_reheat,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let condensate = super::coil::condensate(condensate, condensate_temperature)?;
        let humidity = RelativeHumidity::from_fraction(coil_leaving_relative_humidity);
        // SAFETY: the caller's pointers.
        let (entering, target) = unsafe { (read(entering)?.to_core()?, read(target)?.to_core()?) };
        Ok(reheat::to_state(&entering, &target, humidity, condensate)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

const _: () = assert!(size_of::<moistair_reheat>() == 440);
