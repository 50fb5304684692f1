//! Evaporative cooling: direct, indirect, and one behind the other.
//!
//! Wet media, sumps and droplets can grow and spread Legionella, moist ducts grow mould: hygiene rules and local codes govern.

use moistair_core::process::evaporative::{
    self, DirectCooled, DirectCooler, IndirectCooled, IndirectCooler, IndirectEffectiveness, TwoStageCooled,
};
use moistair_core::{HeatFlow, RelativeHumidity};

use super::humidify::{evaporating_water, moistair_humidified};
use super::stream::{moistair_exchange, moistair_stream};
use super::tower::{moistair_water_treatment, moistair_water_use};
use super::{finite, mass_flow};
use crate::memory::{Answer, answer, read};
use crate::status::{Failure, moistair_error};

/// The effectiveness of an indirect cooler counts toward the wet bulb of the secondary air.
pub const MOISTAIR_EFFECTIVENESS_OF_WET_BULB: i32 = 0;
/// It counts toward the dew point of the secondary air.
pub const MOISTAIR_EFFECTIVENESS_OF_DEW_POINT: i32 = 1;

/// Water evaporates.
pub const MOISTAIR_EVAPORATING: i32 = 0;
/// The air enters saturated: nothing evaporates but by the heat of pump and make-up.
pub const MOISTAIR_ALREADY_SATURATED: i32 = 1;

/// The primary air is cooled and stays dry.
pub const MOISTAIR_INDIRECT_COOLING: i32 = 0;
/// The secondary air is no colder than the primary where it is wet: nothing happens.
pub const MOISTAIR_INDIRECT_NO_DRIVE: i32 = 1;
/// Water condenses out of the primary air.
pub const MOISTAIR_INDIRECT_CONDENSING: i32 = 2;
/// The same below the melting temperature: frost, which no steady state describes.
pub const MOISTAIR_INDIRECT_FROSTING: i32 = 3;

/// A direct evaporative cooler, or a humidifier of wetted media, with its circulating water.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_direct_cooler {
    /// Toward the temperature of the circulating water, 0 to 1 [1].
    pub saturation_effectiveness: f64,
    /// Water over the medium [kg/s].
    pub circulating: f64,
    /// Power of the pump [W].
    pub pump_heat: f64,
    /// Temperature of the make-up, 0 to 200, read for MOISTAIR_WATER_AT_GIVEN only [°C].
    pub make_up_temperature: f64,
    /// Carry-over and cycles of concentration.
    pub treatment: moistair_water_treatment,
    /// Make-up as warm as the circulating water, MOISTAIR_WATER_AT_WET_BULB, or MOISTAIR_WATER_AT_GIVEN.
    pub make_up: i32,
    /// 0.
    pub reserved: i32,
}

/// What a direct evaporative cooler did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_direct_cooled {
    /// The air with its books.
    pub air: moistair_humidified,
    /// Of the circulating water [°C].
    pub water_temperature: f64,
    /// Evaporation, carry-over, bleed and make-up.
    pub water: moistair_water_use,
    /// MOISTAIR_EVAPORATING or MOISTAIR_ALREADY_SATURATED.
    pub condition: i32,
    /// 0.
    pub reserved: i32,
}

/// An indirect evaporative cooler.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_indirect_cooler {
    /// How far the primary air is cooled, if it stays dry: 0 to 2 toward the wet bulb, 0 to 1 toward the dew point [1].
    pub effectiveness: f64,
    /// Relative humidity over liquid at which the secondary air leaves, 0 to 1 [1].
    pub exhaust_humidity: f64,
    /// Power of the pump [W].
    pub pump_heat: f64,
    /// Of the water that evaporates, 0 to 200, read for MOISTAIR_WATER_AT_GIVEN only [°C].
    pub water_temperature: f64,
    /// MOISTAIR_EFFECTIVENESS_OF_WET_BULB or MOISTAIR_EFFECTIVENESS_OF_DEW_POINT.
    pub effectiveness_of: i32,
    /// MOISTAIR_WATER_AT_WET_BULB, of the secondary air, or MOISTAIR_WATER_AT_GIVEN.
    pub water: i32,
}

/// What an indirect evaporative cooler did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_indirect_cooled {
    /// The primary air that leaves, without its condensate.
    pub primary: moistair_stream,
    /// Heat and water into the primary air, none of them above zero.
    pub primary_exchange: moistair_exchange,
    /// The secondary air with its books.
    pub secondary: moistair_humidified,
    /// Heat through the wall [W].
    pub heat: f64,
    /// Water that drains from the primary side [kg/s].
    pub condensate: f64,
    /// MOISTAIR_INDIRECT_COOLING, _NO_DRIVE, _CONDENSING or _FROSTING.
    pub condition: i32,
    /// 0.
    pub reserved: i32,
}

/// What a two-stage evaporative cooler did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_two_stage_cooled {
    /// The first stage.
    pub indirect: moistair_indirect_cooled,
    /// The second stage, on the primary air that the first leaves.
    pub direct: moistair_direct_cooled,
    /// Water that evaporates in both [kg/s].
    pub evaporated: f64,
}

impl moistair_direct_cooler {
    pub(super) fn to_core(self) -> Result<DirectCooler, Failure> {
        Ok(DirectCooler {
            saturation_effectiveness: self.saturation_effectiveness,
            circulating: mass_flow(self.circulating),
            pump_heat: HeatFlow::from_watts(self.pump_heat),
            make_up: evaporating_water(self.make_up, self.make_up_temperature)?,
            treatment: self.treatment.to_core(),
        })
    }
}

impl moistair_indirect_cooler {
    pub(super) fn to_core(self) -> Result<IndirectCooler, Failure> {
        Ok(IndirectCooler {
            effectiveness: match self.effectiveness_of {
                MOISTAIR_EFFECTIVENESS_OF_WET_BULB => IndirectEffectiveness::OfWetBulb(self.effectiveness),
                MOISTAIR_EFFECTIVENESS_OF_DEW_POINT => IndirectEffectiveness::OfDewPoint(self.effectiveness),
                other => return Err(Failure::UnknownSelector(other)),
            },
            exhaust_humidity: RelativeHumidity::from_fraction(self.exhaust_humidity),
            pump_heat: HeatFlow::from_watts(self.pump_heat),
            water: evaporating_water(self.water, self.water_temperature)?,
        })
    }
}

impl From<DirectCooled> for moistair_direct_cooled {
    fn from(done: DirectCooled) -> Self {
        Self {
            air: done.air.into(),
            water_temperature: done.water_temperature.celsius(),
            water: done.water.into(),
            condition: done.status as i32,
            reserved: 0,
        }
    }
}

impl From<IndirectCooled> for moistair_indirect_cooled {
    fn from(done: IndirectCooled) -> Self {
        Self {
            primary: done.primary.into(),
            primary_exchange: done.primary_exchange.into(),
            secondary: done.secondary.into(),
            heat: done.heat.watts(),
            condensate: done.condensate.kilograms_per_second(),
            condition: done.status as i32,
            reserved: 0,
        }
    }
}

impl From<TwoStageCooled> for moistair_two_stage_cooled {
    fn from(done: TwoStageCooled) -> Self {
        Self {
            indirect: done.indirect.into(),
            direct: done.direct.into(),
            evaporated: done.evaporated.kilograms_per_second(),
        }
    }
}

impl Answer for moistair_direct_cooled {
    fn is_finite(&self) -> bool {
        self.air.is_finite() && self.water.is_finite() && finite([self.water_temperature])
    }
}

impl Answer for moistair_indirect_cooled {
    fn is_finite(&self) -> bool {
        self.primary.is_finite()
            && self.primary_exchange.is_finite()
            && self.secondary.is_finite()
            && finite([self.heat, self.condensate])
    }
}

impl Answer for moistair_two_stage_cooled {
    fn is_finite(&self) -> bool {
        self.indirect.is_finite() && self.direct.is_finite() && finite([self.evaporated])
    }
}

/// Cools and humidifies air over a wetted medium whose water circulates, with its pump, carry-over, bleed and make-up.
///
/// entering: the stream that enters; cooler: the cooler; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, more pump heat than the air takes, one cycle of concentration), 31x.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_evaporative_direct(
    entering: *const moistair_stream,
    cooler: *const moistair_direct_cooler,
    done: *mut moistair_direct_cooled,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, cooler) = (unsafe { read(entering) }?.to_core()?, unsafe { read(cooler) }?.to_core()?);
        Ok(evaporative::direct(&entering, cooler)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Cools the primary air by a wetted secondary stream behind a wall, without moistening it. The second law is not looked at, and freezing only at the
/// wet bulb of the secondary air: beyond it (dew-point cycles) use effectivenesses and flows of a test.
///
/// primary, secondary: the streams that enter; cooler: the cooler; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207, 301 (the water would freeze, an effectiveness beyond the dew point of the secondary air, a secondary air that
/// cannot take the heat or leaves drier than it can), 31x.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_evaporative_indirect(
    primary: *const moistair_stream,
    secondary: *const moistair_stream,
    cooler: *const moistair_indirect_cooler,
    done: *mut moistair_indirect_cooled,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (primary, secondary) = (unsafe { read(primary) }?.to_core()?, unsafe { read(secondary) }?.to_core()?);
        // SAFETY: the caller's pointer.
        Ok(evaporative::indirect(&primary, &secondary, unsafe { read(cooler) }?.to_core()?)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Cools the primary air indirectly, then directly.
///
/// primary, secondary: the streams that enter; first: the indirect stage; second: the direct one; done: output; error: may be null.
/// Returns as either stage does.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_evaporative_two_stage(
    primary: *const moistair_stream,
    secondary: *const moistair_stream,
    first: *const moistair_indirect_cooler,
    second: *const moistair_direct_cooler,
    done: *mut moistair_two_stage_cooled,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (primary, secondary) = (unsafe { read(primary) }?.to_core()?, unsafe { read(secondary) }?.to_core()?);
        // SAFETY: the caller's pointers.
        let (first, second) = (unsafe { read(first) }?.to_core()?, unsafe { read(second) }?.to_core()?);
        Ok(evaporative::two_stage(&primary, &secondary, first, second)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

const _: () = {
    assert!(size_of::<moistair_direct_cooler>() == 56 && size_of::<moistair_indirect_cooler>() == 40);
    assert!(size_of::<moistair_direct_cooled>() == 240 && size_of::<moistair_indirect_cooled>() == 344);
    assert!(size_of::<moistair_two_stage_cooled>() == 592);
};
