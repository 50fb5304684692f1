//! Streams, what they carry, and what a process gives to them.

use moistair_core::process::{AirStream, Exchange, WetStream};
use moistair_core::{AirWithCondensate, Density, Freezing, HeatFlow, VolumeFlow};

use super::{celsius, enthalpy, finite, mass_flow, ratio};
use crate::memory::{Answer, answer, read};
use crate::state::{moistair_basis, moistair_state};
use crate::status::{Failure, moistair_error};

/// Water below the melting temperature freezes.
pub const MOISTAIR_FREEZING_EQUILIBRIUM: i32 = 0;
/// Water stays liquid, supercooled, down to -40 °C.
pub const MOISTAIR_FREEZING_SUPERCOOLED: i32 = 1;

/// Moist air with its dry-air mass flow.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_stream {
    /// State of the air.
    pub air: moistair_state,
    /// Dry-air mass flow [kg/s].
    pub dry_air_flow: f64,
}

/// Moist air with the liquid water and ice that it carries.
/// As an input air, liquid and ice are read, and checked; the rest is computed anew.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_air_with_condensate {
    /// State of the gas.
    pub air: moistair_state,
    /// Liquid water per mass of dry air [kg/kg].
    pub liquid: f64,
    /// Ice per mass of dry air [kg/kg].
    pub ice: f64,
    /// Vapor, liquid and ice per mass of dry air [kg/kg].
    pub total_water: f64,
    /// Enthalpy of gas and condensate per mass of dry air [J/kg].
    pub specific_enthalpy: f64,
}

/// Air that may carry condensate, with its dry-air mass flow. The stream of its gas alone is {mixture.air, dry_air_flow}.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_wet_stream {
    /// Gas and condensate.
    pub mixture: moistair_air_with_condensate,
    /// Dry-air mass flow [kg/s].
    pub dry_air_flow: f64,
}

/// What a process gave to the air.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_exchange {
    /// Heat through a surface, into the air [W].
    pub heat: f64,
    /// Water into the air [kg/s]; negative for condensate.
    pub water: f64,
    /// Enthalpy that came with that water [W].
    pub water_enthalpy_flow: f64,
}

impl moistair_stream {
    pub(super) fn to_core(self) -> Result<AirStream, Failure> {
        Ok(AirStream::new(self.air.to_core()?, mass_flow(self.dry_air_flow))?)
    }
}

impl moistair_air_with_condensate {
    pub(super) fn to_core(self) -> Result<AirWithCondensate, Failure> {
        Ok(AirWithCondensate::new(self.air.to_core()?, ratio(self.liquid), ratio(self.ice))?)
    }
}

impl moistair_wet_stream {
    pub(super) fn to_core(self) -> Result<WetStream, Failure> {
        Ok(WetStream::new(self.mixture.to_core()?, mass_flow(self.dry_air_flow))?)
    }
}

impl From<AirStream> for moistair_stream {
    fn from(stream: AirStream) -> Self {
        Self { air: stream.air().into(), dry_air_flow: stream.dry_air_flow().kilograms_per_second() }
    }
}

impl From<AirWithCondensate> for moistair_air_with_condensate {
    fn from(wet: AirWithCondensate) -> Self {
        Self {
            air: wet.air().into(),
            liquid: wet.liquid().kilograms_per_kilogram(),
            ice: wet.ice().kilograms_per_kilogram(),
            total_water: wet.total_water().kilograms_per_kilogram(),
            specific_enthalpy: wet.specific_enthalpy().joules_per_kilogram(),
        }
    }
}

impl From<WetStream> for moistair_wet_stream {
    fn from(stream: WetStream) -> Self {
        Self { mixture: stream.air().into(), dry_air_flow: stream.dry_air_flow().kilograms_per_second() }
    }
}

impl From<Exchange> for moistair_exchange {
    fn from(exchange: Exchange) -> Self {
        Self {
            heat: exchange.heat.watts(),
            water: exchange.water.kilograms_per_second(),
            water_enthalpy_flow: exchange.water_enthalpy_flow.watts(),
        }
    }
}

impl From<moistair_exchange> for Exchange {
    fn from(exchange: moistair_exchange) -> Self {
        Self {
            heat: HeatFlow::from_watts(exchange.heat),
            water: mass_flow(exchange.water),
            water_enthalpy_flow: HeatFlow::from_watts(exchange.water_enthalpy_flow),
        }
    }
}

impl Answer for moistair_stream {
    fn is_finite(&self) -> bool {
        self.air.is_finite() && finite([self.dry_air_flow])
    }
}

impl Answer for moistair_air_with_condensate {
    fn is_finite(&self) -> bool {
        self.air.is_finite() && finite([self.liquid, self.ice, self.total_water, self.specific_enthalpy])
    }
}

impl Answer for moistair_wet_stream {
    fn is_finite(&self) -> bool {
        self.mixture.is_finite() && finite([self.dry_air_flow])
    }
}

impl Answer for moistair_exchange {
    fn is_finite(&self) -> bool {
        finite([self.heat, self.water, self.water_enthalpy_flow])
    }
}

pub(super) fn freezing(selector: i32) -> Result<Freezing, Failure> {
    match selector {
        MOISTAIR_FREEZING_EQUILIBRIUM => Ok(Freezing::Equilibrium),
        MOISTAIR_FREEZING_SUPERCOOLED => Ok(Freezing::Supercooled),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

/// A stream from its dry-air mass flow.
///
/// air: a state; dry_air_flow: [kg/s], 0 to 1e6; stream: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_stream_from_mass_flow(
    air: *const moistair_state,
    dry_air_flow: f64,
    stream: *mut moistair_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(AirStream::new(unsafe { read(air) }?.to_core()?, mass_flow(dry_air_flow))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(stream, error, call) }
}

/// A stream from its volume flow at the state of the air.
///
/// air: a state; volume_flow: [m³/s], 0 to 1e6; stream: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_stream_from_volume_flow(
    air: *const moistair_state,
    volume_flow: f64,
    stream: *mut moistair_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let flow = VolumeFlow::from_cubic_meters_per_second(volume_flow);
        // SAFETY: the caller's pointers.
        Ok(AirStream::from_volume_flow(unsafe { read(air) }?.to_core()?, flow)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(stream, error, call) }
}

/// A stream from a standard volume flow: that of its dry air at a reference density.
///
/// air: a state; volume_flow: [m³/s], 0 to 1e6; reference_density: [kg/m³] of dry air, such as 1.2; 0.5 to 2; stream: output; error: may be
/// null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_stream_from_standard_volume_flow(
    air: *const moistair_state,
    volume_flow: f64,
    reference_density: f64,
    stream: *mut moistair_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let flow = VolumeFlow::from_cubic_meters_per_second(volume_flow);
        let density = Density::from_kilograms_per_cubic_meter(reference_density);
        // SAFETY: the caller's pointers.
        Ok(AirStream::from_standard_volume_flow(unsafe { read(air) }?.to_core()?, flow, density)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(stream, error, call) }
}

/// A stream that carries liquid water and ice.
///
/// stream: the gas; liquid: [kg/kg] of dry air, 0 to 10; ice: [kg/kg] of dry air, 0 to 10; wet_stream: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_wet_stream_from_stream(
    stream: *const moistair_stream,
    liquid: f64,
    ice: f64,
    wet_stream: *mut moistair_wet_stream,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let gas = unsafe { read(stream) }?.to_core()?;
        let wet = AirWithCondensate::new(gas.air(), ratio(liquid), ratio(ice))?;
        Ok(WetStream::new(wet, gas.dry_air_flow())?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(wet_stream, error, call) }
}

/// Vapor and condensate in equilibrium at a temperature, from the water of all phases together: as much vapor as the air holds, the rest ice
/// below the melting temperature and liquid from there on (liquid down to -40 °C if supercooled).
///
/// dry_bulb: [°C], -80 to 150; total_water: [kg/kg] of dry air, 0 to 10; freezing: MOISTAIR_FREEZING_EQUILIBRIUM or
/// MOISTAIR_FREEZING_SUPERCOOLED; basis: pressure and formulation; mixture: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_from_dry_bulb_and_water(
    dry_bulb: f64,
    total_water: f64,
    freezing: i32,
    basis: moistair_basis,
    mixture: *mut moistair_air_with_condensate,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let freezing = self::freezing(freezing)?;
        let (dry_bulb, water) = (celsius(dry_bulb), ratio(total_water));
        Ok(AirWithCondensate::from_dry_bulb_and_water(dry_bulb, water, freezing, basis.to_core()?)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(mixture, error, call) }
}

/// Vapor, liquid and ice in equilibrium, from the enthalpy and the water of all phases together.
///
/// specific_enthalpy: [J/kg] of dry air; total_water: [kg/kg] of dry air, 0 to 10; freezing: MOISTAIR_FREEZING_EQUILIBRIUM or
/// MOISTAIR_FREEZING_SUPERCOOLED; basis: pressure and formulation; mixture: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (outside the range of states).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_from_enthalpy_and_water(
    specific_enthalpy: f64,
    total_water: f64,
    freezing: i32,
    basis: moistair_basis,
    mixture: *mut moistair_air_with_condensate,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let freezing = self::freezing(freezing)?;
        let (enthalpy, water) = (enthalpy(specific_enthalpy), ratio(total_water));
        Ok(AirWithCondensate::from_enthalpy_and_water(enthalpy, water, freezing, basis.to_core()?)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(mixture, error, call) }
}

/// Specific enthalpy of liquid water on the datum of a basis.
///
/// temperature: [°C], 0 to 200; basis: pressure and formulation; specific_enthalpy: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_liquid_water_enthalpy(
    temperature: f64,
    basis: moistair_basis,
    specific_enthalpy: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let enthalpy = moistair_core::liquid_water_enthalpy(celsius(temperature), basis.to_core()?)?;
        Ok(enthalpy.joules_per_kilogram())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(specific_enthalpy, error, call) }
}

const _: () = {
    assert!(size_of::<moistair_stream>() == 112 && size_of::<moistair_exchange>() == 24);
    assert!(size_of::<moistair_air_with_condensate>() == 136 && size_of::<moistair_wet_stream>() == 144);
    assert!(Freezing::Equilibrium as i32 == MOISTAIR_FREEZING_EQUILIBRIUM);
    assert!(Freezing::Supercooled as i32 == MOISTAIR_FREEZING_SUPERCOOLED);
};
