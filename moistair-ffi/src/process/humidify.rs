//! Humidifying by steam, spray and wetted media.

use moistair_core::process::humidify::{
    self, Absorption, EvaporatingWater, Humidified, Steam, ThrottledSteam, Washed, Washer,
};
use moistair_core::{Error, HeatFlow, MassFlow, Pressure, RelativeHumidity};

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
    /// Water into the air and its enthalpy; heat is that of pump, make-up, spray or wall where there is one, else 0.
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

/// The air takes up water of the washer, or none.
pub const MOISTAIR_HUMIDIFIES: i32 = 0;
/// Vapor of the air condenses on the water.
pub const MOISTAIR_DEHUMIDIFIES: i32 = 1;

/// Steam is superheated, or saturated without water.
pub const MOISTAIR_STEAM_SUPERHEATED: i32 = 0;
/// Steam carries water.
pub const MOISTAIR_STEAM_WET: i32 = 1;

/// How much steam air takes up.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_steam_absorption {
    /// Flow at which the air first saturates, 0 where it enters saturated; infinite where it never does [kg/s].
    pub up_to: f64,
    /// Flow from which on it is no longer saturated; infinite where there is none [kg/s].
    pub unsaturated_from: f64,
}

/// Steam at a pressure.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_throttled_steam {
    /// [°C]
    pub temperature: f64,
    /// Above the temperature of boiling; 0 where it is wet [K].
    pub superheat: f64,
    /// Vapor over all of it by mass; 1 where it is superheated [1].
    pub quality: f64,
    /// MOISTAIR_STEAM_SUPERHEATED or MOISTAIR_STEAM_WET.
    pub condition: i32,
    /// 0.
    pub reserved: i32,
}

/// A washer and its water.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_washer {
    /// Water sprayed [kg/s].
    pub water: f64,
    /// Its temperature, 0 to 200 [°C].
    pub temperature: f64,
    /// How far the air comes toward the temperature of the water that leaves, 0 to 1 [1].
    pub effectiveness: f64,
    /// Power of the pump [W].
    pub pump_heat: f64,
    /// Droplets that pass the eliminators over the water sprayed, 0 to 0.05 [1].
    pub carry_over_fraction: f64,
}

/// What a washer did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_washed {
    /// The air with its books.
    pub air: moistair_humidified,
    /// Water that falls back [kg/s].
    pub leaving_water: f64,
    /// Its temperature [°C].
    pub leaving_water_temperature: f64,
    /// What the water gains, its pump counted, less the enthalpy of what evaporated; negative where the air cools it [W]. Not the load of a chiller.
    pub heat_to_water: f64,
    /// MOISTAIR_HUMIDIFIES or MOISTAIR_DEHUMIDIFIES.
    pub moistening: i32,
    /// 0.
    pub reserved: i32,
}

impl From<Absorption> for moistair_steam_absorption {
    fn from(found: Absorption) -> Self {
        let flow = |found: Option<MassFlow>| found.map_or(f64::INFINITY, MassFlow::kilograms_per_second);
        Self { up_to: flow(found.first_saturation()), unsaturated_from: flow(found.unsaturated_again()) }
    }
}

impl Answer for moistair_steam_absorption {
    fn is_finite(&self) -> bool {
        !self.up_to.is_nan() && !self.unsaturated_from.is_nan()
    }
}

impl From<ThrottledSteam> for moistair_throttled_steam {
    fn from(steam: ThrottledSteam) -> Self {
        Self {
            temperature: steam.temperature.celsius(),
            superheat: steam.superheat.kelvins(),
            quality: steam.quality,
            condition: steam.condition as i32,
            reserved: 0,
        }
    }
}

impl Answer for moistair_throttled_steam {
    fn is_finite(&self) -> bool {
        finite([self.temperature, self.superheat, self.quality])
    }
}

impl moistair_washer {
    pub(super) fn to_core(self) -> Washer {
        Washer {
            water: mass_flow(self.water),
            temperature: celsius(self.temperature),
            effectiveness: self.effectiveness,
            pump_heat: HeatFlow::from_watts(self.pump_heat),
            carry_over_fraction: self.carry_over_fraction,
        }
    }
}

impl From<Washed> for moistair_washed {
    fn from(done: Washed) -> Self {
        Self {
            air: done.air.into(),
            leaving_water: done.leaving_water.kilograms_per_second(),
            leaving_water_temperature: done.leaving_water_temperature.celsius(),
            heat_to_water: done.heat_to_water.watts(),
            moistening: done.moistening as i32,
            reserved: 0,
        }
    }
}

impl Answer for moistair_washed {
    fn is_finite(&self) -> bool {
        self.air.is_finite() && finite([self.leaving_water, self.leaving_water_temperature, self.heat_to_water])
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
        Ok(Limit(moistair_steam_absorption::from(limit).up_to))
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(limit.cast::<Limit>(), error, call) }
}

/// The steam flow at which the air first saturates, and that from which on it no longer is: superheated steam may lead into saturation and out
/// of it again. Between the two a part of the steam condenses.
///
/// entering: the stream that enters; steam_enthalpy: specific enthalpy of the steam [J/kg], 251e3 to 4e6; absorption: output; error: may be
/// null.
/// Returns 0, 1xx, 2xx, 207.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_steam_absorption(
    entering: *const moistair_stream,
    steam_enthalpy: f64,
    absorption: *mut moistair_steam_absorption,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(humidify::steam_limit(&unsafe { read(entering) }?.to_core()?, enthalpy(steam_enthalpy))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(absorption, error, call) }
}

/// Specific enthalpy of dry saturated steam of a pressure, on the datum of liquid water at the triple point.
///
/// pressure: absolute [Pa], 1e3 to 1.6e6; specific_enthalpy: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_steam_saturated(
    pressure: f64,
    specific_enthalpy: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || joules(Steam::saturated_at_pressure(Pressure::from_pascals(pressure)));
    // SAFETY: the caller's pointers.
    unsafe { answer(specific_enthalpy, error, call) }
}

/// Specific enthalpy of wet steam, h = h_f + x h_fg.
///
/// pressure: absolute [Pa], 1e3 to 1.6e6; quality: x, vapor over all of it by mass [1]; specific_enthalpy: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_steam_wet(
    pressure: f64,
    quality: f64,
    specific_enthalpy: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || joules(Steam::wet(Pressure::from_pascals(pressure), quality));
    // SAFETY: the caller's pointers.
    unsafe { answer(specific_enthalpy, error, call) }
}

/// Specific enthalpy of superheated steam.
///
/// temperature: [°C], to 400; pressure: absolute [Pa], 1e3 to 1.6e6; specific_enthalpy: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (below the temperature of boiling).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_steam_superheated(
    temperature: f64,
    pressure: f64,
    specific_enthalpy: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || joules(Steam::superheated(celsius(temperature), Pressure::from_pascals(pressure)));
    // SAFETY: the caller's pointers.
    unsafe { answer(specific_enthalpy, error, call) }
}

/// Steam after throttling, such as to the pressure of the duct: its enthalpy is kept.
///
/// specific_enthalpy: of the steam [J/kg], 251e3 to 4e6; pressure: absolute, after it [Pa], 1e3 to 1.6e6; steam: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (liquid, or hotter than 400 °C).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_steam_throttled(
    specific_enthalpy: f64,
    pressure: f64,
    steam: *mut moistair_throttled_steam,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let known = Steam::from_specific_enthalpy(enthalpy(specific_enthalpy))?;
        Ok(known.throttled_to(Pressure::from_pascals(pressure))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(steam, error, call) }
}

/// Washes air with water of any temperature: below the dew point it takes water out of the air.
///
/// entering: the stream that enters; washer: the washer; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, is hotter than the air takes, or would all evaporate).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_humidify_wash(
    entering: *const moistair_stream,
    washer: *const moistair_washer,
    done: *mut moistair_washed,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, washer) = (unsafe { read(entering) }?.to_core()?, unsafe { read(washer) }?.to_core());
        Ok(humidify::wash(&entering, washer)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

fn joules(steam: Result<Steam, Error>) -> Result<f64, Failure> {
    Ok(steam?.specific_enthalpy().joules_per_kilogram())
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

const _: () = {
    assert!(size_of::<moistair_humidified>() == 184 && size_of::<moistair_washed>() == 216);
    assert!(size_of::<moistair_steam_absorption>() == 16 && size_of::<moistair_throttled_steam>() == 32);
    assert!(size_of::<moistair_washer>() == 40);
};
