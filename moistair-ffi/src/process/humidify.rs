//! Humidifying by steam, spray and wetted media.

use moistair_core::RelativeHumidity;
use moistair_core::process::humidify::{self, Absorption, EvaporatingWater, Humidified};

use super::stream::{moistair_exchange, moistair_stream, moistair_wet_stream};
use super::{celsius, enthalpy, finite, mass_flow, ratio};
use crate::memory::{Answer, answer, read};
use crate::status::{Failure, moistair_error};

/// A wetted medium evaporates water at the wet bulb, where recirculated water settles.
pub const MOISTAIR_WATER_AT_WET_BULB: i32 = 0;
/// A wetted medium evaporates water of a given temperature.
pub const MOISTAIR_WATER_AT_GIVEN: i32 = 1;

/// What a humidifier did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_humidified {
    /// The air that leaves, with what it could not take up.
    pub leaving: moistair_wet_stream,
    /// Water into the air and its enthalpy, no heat.
    pub exchange: moistair_exchange,
    /// Water that became vapor [kg/s].
    pub evaporated: f64,
    /// Water carried as droplets or ice [kg/s].
    pub carried: f64,
}

impl From<Humidified> for moistair_humidified {
    fn from(done: Humidified) -> Self {
        Self {
            leaving: done.leaving.into(),
            exchange: done.exchange.into(),
            evaporated: done.evaporated.kilograms_per_second(),
            carried: done.carried.kilograms_per_second(),
        }
    }
}

impl Answer for moistair_humidified {
    fn is_finite(&self) -> bool {
        self.leaving.is_finite() && self.exchange.is_finite() && finite([self.evaporated, self.carried])
    }
}

/// A flow that may be without limit.
#[repr(transparent)]
#[derive(Clone, Copy)]
struct Limit(f64);

impl Answer for Limit {
    fn is_finite(&self) -> bool {
        !self.0.is_nan()
    }
}

/// Specific enthalpy of saturated steam, IAPWS-95, on the datum of liquid water at the triple point.
///
/// temperature: [°C], 0 to 200; specific_enthalpy: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_saturated_steam_enthalpy(
    temperature: f64,
    specific_enthalpy: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(humidify::saturated_steam_enthalpy(celsius(temperature))?.joules_per_kilogram());
    // SAFETY: the caller's pointers.
    unsafe { answer(specific_enthalpy, error, call) }
}

/// Adds steam; what the air cannot take up is carried.
///
/// entering: the stream that enters; steam: [kg/s], 0 to 1e6; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; done:
/// output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_steam(
    entering: *const moistair_stream,
    steam: f64,
    steam_enthalpy: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(humidify::steam(&unsafe { read(entering) }?.to_core()?, mass_flow(steam), enthalpy(steam_enthalpy))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Adds steam up to a humidity ratio.
///
/// entering: the stream that enters; humidity_ratio: [kg/kg]; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; done:
/// output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (below what enters).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_steam_to_humidity_ratio(
    entering: *const moistair_stream,
    humidity_ratio: f64,
    steam_enthalpy: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (target, enthalpy) = (ratio(humidity_ratio), enthalpy(steam_enthalpy));
        // SAFETY: the caller's pointers.
        Ok(humidify::steam_to_humidity_ratio(&unsafe { read(entering) }?.to_core()?, target, enthalpy)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Adds steam up to a relative humidity over the stable surface.
///
/// entering: the stream that enters; relative_humidity: [1], 0 to 1; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; done:
/// output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (below what enters, or never reached).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_steam_to_relative_humidity(
    entering: *const moistair_stream,
    relative_humidity: f64,
    steam_enthalpy: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let target = RelativeHumidity::from_fraction(relative_humidity);
        let enthalpy = enthalpy(steam_enthalpy);
        // SAFETY: the caller's pointers.
        Ok(humidify::steam_to_relative_humidity(&unsafe { read(entering) }?.to_core()?, target, enthalpy)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The steam flow at which the air first saturates.
///
/// entering: the stream that enters; steam_enthalpy: specific enthalpy of the steam [J/kg], 0 to 4e6; limit: output [kg/s], infinite if
/// there is none; error: may be null.
/// Returns 0, 1xx, 2xx, 207.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_steam_limit(
    entering: *const moistair_stream,
    steam_enthalpy: f64,
    limit: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let limit = humidify::steam_limit(&unsafe { read(entering) }?.to_core()?, enthalpy(steam_enthalpy))?;
        Ok(Limit(match limit {
            Absorption::UpTo(flow) => flow.kilograms_per_second(),
            Absorption::Unlimited => f64::INFINITY,
        }))
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(limit.cast::<Limit>(), error, call) }
}

/// Sprays liquid water; what equilibrium does not evaporate is carried.
///
/// entering: the stream that enters; water: [kg/s], 0 to 1e6; water_temperature: [°C], 0 to 200; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_spray(
    entering: *const moistair_stream,
    water: f64,
    water_temperature: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(humidify::spray(&unsafe { read(entering) }?.to_core()?, mass_flow(water), celsius(water_temperature))?
            .into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

pub(super) fn evaporating_water(selector: i32, temperature: f64) -> Result<EvaporatingWater, Failure> {
    match selector {
        MOISTAIR_WATER_AT_WET_BULB => Ok(EvaporatingWater::AtWetBulb),
        MOISTAIR_WATER_AT_GIVEN => Ok(EvaporatingWater::Given(celsius(temperature))),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

/// A wetted medium or full spray of a known saturation effectiveness.
///
/// entering: the stream that enters; saturation_effectiveness: [1], 0 to 1; water: MOISTAIR_WATER_AT_WET_BULB or MOISTAIR_WATER_AT_GIVEN;
/// water_temperature: [°C], 0 to 200, read for MOISTAIR_WATER_AT_GIVEN only; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the wet bulb is below freezing), 31x.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_evaporative(
    entering: *const moistair_stream,
    saturation_effectiveness: f64,
    water: i32,
    water_temperature: f64,
    done: *mut moistair_humidified,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let water = evaporating_water(water, water_temperature)?;
        // SAFETY: the caller's pointers.
        Ok(humidify::evaporative(&unsafe { read(entering) }?.to_core()?, saturation_effectiveness, water)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

const _: () = assert!(size_of::<moistair_humidified>() == 184);
