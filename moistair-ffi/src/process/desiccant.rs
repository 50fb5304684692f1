//! Drying by a desiccant: along the line of adiabatic sorption, and in a wheel that hot air regenerates.
//!
//! Hot regeneration air burns, and ignites dust and lint: makers' instructions, cut-outs in hardware and fire codes govern. Moist exhaust and
//! moist ducts grow mould. Nothing here is a safety function.

use moistair_core::columns::NAN;
use moistair_core::process::desiccant::potentials::{
    self, CorrelationStatus, Effectiveness, Imbalance, PotentialWheel, effectiveness_between,
};
use moistair_core::process::desiccant::{self, CarryOver, Regeneration, Sorbed, Sorption, Wheel, WheelStatus};
use moistair_core::{HeatFlow, SpecificEnthalpy, TemperatureDifference};

use super::sensible::moistair_sensible;
use super::stream::{moistair_exchange, moistair_stream};
use super::{celsius, finite, ratio};
use crate::memory::{Answer, answer, read};
use crate::state::moistair_state;
use crate::status::{Failure, moistair_error};

/// The matrix of a wheel carries no heat over.
pub const MOISTAIR_CARRIES_NOTHING: i32 = 0;
/// The matrix carries a heat flow into the air [W].
pub const MOISTAIR_CARRIES_HEAT: i32 = 1;
/// The matrix warms the leaving air by so much beyond the line of sorption [K].
pub const MOISTAIR_CARRIES_RISE: i32 = 2;

/// The heat of the regeneration is given [W].
pub const MOISTAIR_REGENERATION_HEAT: i32 = 0;
/// The temperature of the air between heater and wheel is given [°C].
pub const MOISTAIR_REGENERATION_ENTERING: i32 = 1;
/// The temperature of the air behind the wheel is given [°C].
pub const MOISTAIR_REGENERATION_LEAVING: i32 = 2;

/// Nothing forbids such a wheel.
pub const MOISTAIR_WHEEL_POSSIBLE: i32 = 0;
/// Such a wheel would destroy entropy.
pub const MOISTAIR_WHEEL_AGAINST_SECOND_LAW: i32 = 1;

/// The correlation was made for this.
pub const MOISTAIR_CORRELATION_WITHIN: i32 = 0;
/// The pressure is more than 5 % off 101 325 Pa, for which the correlation was made.
pub const MOISTAIR_CORRELATION_OFF_STANDARD_PRESSURE: i32 = 1;

/// What a desiccant does beside taking up water.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_sorption {
    /// Heat of sorption over heat of vaporization [1], 0.5 to 3; about 1.05 to 1.15 for silica gel, 1.2 and more for zeolites.
    pub heat_ratio: f64,
    /// Heat [W] or rise [K] that the matrix carries over.
    pub carry_over_value: f64,
    /// MOISTAIR_CARRIES_NOTHING, MOISTAIR_CARRIES_HEAT or MOISTAIR_CARRIES_RISE.
    pub carry_over: i32,
    /// 0.
    pub reserved: i32,
}

impl moistair_sorption {
    pub(super) fn to_core(self) -> Result<Sorption, Failure> {
        let value = self.carry_over_value;
        let carry_over = match self.carry_over {
            MOISTAIR_CARRIES_NOTHING => CarryOver::None,
            MOISTAIR_CARRIES_HEAT => CarryOver::Heat(HeatFlow::from_watts(value)),
            MOISTAIR_CARRIES_RISE => CarryOver::Rise(TemperatureDifference::from_kelvins(value)),
            other => return Err(Failure::UnknownSelector(other)),
        };
        Ok(Sorption { heat_ratio: self.heat_ratio, carry_over })
    }
}

/// Air that gave water to a desiccant, or took it back.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_sorbed {
    /// The air that leaves.
    pub leaving: moistair_stream,
    /// The heat carried over, and the water with what is left of its enthalpy.
    pub exchange: moistair_exchange,
    /// Water that went into the desiccant [kg/s]; negative where it came out.
    pub removed: f64,
    /// Heat of sorption that the air took up [W].
    pub sorption_heat: f64,
    /// Heat that the matrix carried over [W].
    pub carried_heat: f64,
}

impl From<Sorbed> for moistair_sorbed {
    fn from(done: Sorbed) -> Self {
        Self {
            leaving: done.leaving.into(),
            exchange: done.exchange.into(),
            removed: done.removed.kilograms_per_second(),
            sorption_heat: done.sorption_heat.watts(),
            carried_heat: done.carried_heat.watts(),
        }
    }
}

impl Answer for moistair_sorbed {
    fn is_finite(&self) -> bool {
        let parts = [self.removed, self.sorption_heat, self.carried_heat];
        self.leaving.is_finite() && self.exchange.is_finite() && finite(parts)
    }
}

/// A desiccant wheel with the heater of its regeneration.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_wheel {
    /// The side that is dried.
    pub process: moistair_sorbed,
    /// The heater in the regeneration air; its leaving air enters the wheel.
    pub heater: moistair_sensible,
    /// The regeneration air behind the wheel.
    pub regeneration: moistair_stream,
    /// What the wheel gave to it.
    pub regeneration_exchange: moistair_exchange,
    /// Heat of the regeneration [W].
    pub regeneration_heat: f64,
    /// Heat of the regeneration per water removed [J/kg]; NaN where none is.
    pub heat_per_water: f64,
    /// Entropy that the wheel produces [W/K]; below zero against the second law.
    pub entropy_production: f64,
    /// MOISTAIR_WHEEL_POSSIBLE or MOISTAIR_WHEEL_AGAINST_SECOND_LAW.
    pub status: i32,
    /// 0.
    pub reserved: i32,
}

impl From<Wheel> for moistair_wheel {
    fn from(done: Wheel) -> Self {
        Self {
            process: done.process.into(),
            heater: done.heater.into(),
            regeneration: done.regeneration.into(),
            regeneration_exchange: done.regeneration_exchange.into(),
            regeneration_heat: done.regeneration_heat().watts(),
            heat_per_water: done.heat_per_water().map_or(NAN, SpecificEnthalpy::joules_per_kilogram),
            entropy_production: done.entropy_production,
            status: done.status as i32,
            reserved: 0,
        }
    }
}

impl Answer for moistair_wheel {
    fn is_finite(&self) -> bool {
        let streams = self.process.is_finite() && self.heater.is_finite() && self.regeneration.is_finite();
        streams && self.regeneration_exchange.is_finite() && finite([self.regeneration_heat, self.entropy_production])
    }
}

/// Of the two potentials of air, or of the effectiveness of a wheel in them, one each.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_potentials {
    /// Near enthalpy [1].
    pub first: f64,
    /// Near relative humidity [1].
    pub second: f64,
}

impl Answer for moistair_potentials {
    fn is_finite(&self) -> bool {
        finite([self.first, self.second])
    }
}

/// A wheel by its potentials.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_potential_wheel {
    /// The process air behind the wheel.
    pub process: moistair_stream,
    /// What it exchanged.
    pub exchange: moistair_exchange,
    /// The regeneration air behind the wheel, by the balance of both sides.
    pub regeneration: moistair_stream,
    /// What it exchanged.
    pub regeneration_exchange: moistair_exchange,
    /// Water that went from the process to the regeneration air [kg/s]; negative where it went the other way.
    pub removed: f64,
    /// Heat that both streams would leave with beyond what they entered with, were both led by the potentials [W]; NaN where they give no state.
    pub imbalance_heat: f64,
    /// Water, likewise [kg/s].
    pub imbalance_water: f64,
    /// Entropy that the wheel produces [W/K].
    pub entropy_production: f64,
    /// MOISTAIR_WHEEL_POSSIBLE or MOISTAIR_WHEEL_AGAINST_SECOND_LAW.
    pub status: i32,
    /// MOISTAIR_CORRELATION_WITHIN or MOISTAIR_CORRELATION_OFF_STANDARD_PRESSURE.
    pub correlation: i32,
}

impl From<PotentialWheel> for moistair_potential_wheel {
    fn from(done: PotentialWheel) -> Self {
        let left = |part: fn(Imbalance) -> f64| done.imbalance.map_or(NAN, part);
        Self {
            process: done.process.into(),
            exchange: done.exchange.into(),
            regeneration: done.regeneration.into(),
            regeneration_exchange: done.regeneration_exchange.into(),
            removed: done.removed.kilograms_per_second(),
            imbalance_heat: left(|imbalance| imbalance.heat.watts()),
            imbalance_water: left(|imbalance| imbalance.water.kilograms_per_second()),
            entropy_production: done.entropy_production,
            status: done.status as i32,
            correlation: done.correlation as i32,
        }
    }
}

impl Answer for moistair_potential_wheel {
    fn is_finite(&self) -> bool {
        let streams = self.process.is_finite() && self.regeneration.is_finite();
        let exchanges = self.exchange.is_finite() && self.regeneration_exchange.is_finite();
        streams && exchanges && finite([self.removed, self.entropy_production])
    }
}

/// Leads air along the line of sorption to a humidity ratio. A moister target runs the line backwards, as in regeneration.
///
/// entering: the stream that enters; target: humidity ratio [kg/kg]; sorption: what the desiccant does; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207 (no flow), 301 (the leaving air would be fog, or outside the range of states).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_desiccant_to_humidity_ratio(
    entering: *const moistair_stream,
    target: f64,
    sorption: *const moistair_sorption,
    done: *mut moistair_sorbed,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, sorption) = unsafe { (read(entering)?.to_core()?, read(sorption)?.to_core()?) };
        Ok(desiccant::to_humidity_ratio(&entering, ratio(target), sorption)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Dries by an effectiveness on humidity ratio.
///
/// entering: the stream that enters; effectiveness: [1], 0 to 1; driest: humidity ratio that the desiccant could reach at best [kg/kg]; sorption:
/// what the desiccant does; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207 (no flow), 301 (the air enters drier).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_desiccant_by_effectiveness(
    entering: *const moistair_stream,
    effectiveness: f64,
    driest: f64,
    sorption: *const moistair_sorption,
    done: *mut moistair_sorbed,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, sorption) = unsafe { (read(entering)?.to_core()?, read(sorption)?.to_core()?) };
        Ok(desiccant::by_effectiveness(&entering, effectiveness, ratio(driest), sorption)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// A wheel that dries air to a humidity ratio, both sides by balances, with the heater of its regeneration.
///
/// entering: the stream that is dried; target: humidity ratio [kg/kg]; sorption: what the desiccant does; regeneration: the stream that enters the
/// heater; known: what of the heater is given, MOISTAIR_REGENERATION_…; value: that [W] or [°C]; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207 (no flow), 301 (the heater would have to cool; the regeneration air cannot take the water up).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_desiccant_wheel(
    entering: *const moistair_stream,
    target: f64,
    sorption: *const moistair_sorption,
    regeneration: *const moistair_stream,
    known: i32,
    value: f64,
    done: *mut moistair_wheel,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let known = match known {
            MOISTAIR_REGENERATION_HEAT => Regeneration::Heat(HeatFlow::from_watts(value)),
            MOISTAIR_REGENERATION_ENTERING => Regeneration::Entering(celsius(value)),
            MOISTAIR_REGENERATION_LEAVING => Regeneration::Leaving(celsius(value)),
            other => return Err(Failure::UnknownSelector(other)),
        };
        // SAFETY: the caller's pointers.
        let (entering, sorption, regeneration) =
            unsafe { (read(entering)?.to_core()?, read(sorption)?.to_core()?, read(regeneration)?.to_core()?) };
        Ok(desiccant::wheel(&entering, ratio(target), sorption, &regeneration, known)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The potentials of air over silica gel.
///
/// air: a state, of 275 to 425 K; found: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (air without vapor).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_desiccant_potentials(
    air: *const moistair_state,
    found: *mut moistair_potentials,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (first, second) = potentials::potentials(&unsafe { read(air) }?.to_core()?)?;
        Ok(moistair_potentials { first, second })
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(found, error, call) }
}

/// A wheel of silica gel by its potentials: rough, see what they leave over. The heater before it is moistair_sensible_….
///
/// entering: the stream that is dried; regeneration: the hot stream; effectiveness: [1] in each potential, 0 to 1; done: output; error: may be
/// null.
/// Returns 0, 1xx, 2xx, 207 (no flow), 301 (air without vapor, fog, or a result outside 275 to 425 K).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_desiccant_wheel_by_potentials(
    entering: *const moistair_stream,
    regeneration: *const moistair_stream,
    effectiveness: *const moistair_potentials,
    done: *mut moistair_potential_wheel,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, regeneration, share) =
            unsafe { (read(entering)?.to_core()?, read(regeneration)?.to_core()?, read(effectiveness)?) };
        let share = Effectiveness { first: share.first, second: share.second };
        Ok(potentials::wheel(&entering, &regeneration, share)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The effectiveness of a wheel in each potential, from a test.
///
/// air: the state that is dried; dried: that behind the wheel; regeneration: the hot state before the wheel; found: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (a result outside 0 to 1, air without vapor).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_desiccant_effectiveness_between(
    air: *const moistair_state,
    dried: *const moistair_state,
    regeneration: *const moistair_state,
    found: *mut moistair_potentials,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (air, dried, regeneration) =
            unsafe { (read(air)?.to_core()?, read(dried)?.to_core()?, read(regeneration)?.to_core()?) };
        let found = effectiveness_between(&air, &dried, &regeneration)?;
        Ok(moistair_potentials { first: found.first, second: found.second })
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(found, error, call) }
}

const _: () = {
    assert!(size_of::<moistair_sorption>() == 24 && size_of::<moistair_sorbed>() == 160);
    assert!(size_of::<moistair_wheel>() == 464 && size_of::<moistair_potentials>() == 16);
    assert!(size_of::<moistair_potential_wheel>() == 312);
    assert!(WheelStatus::Possible as i32 == MOISTAIR_WHEEL_POSSIBLE);
    assert!(WheelStatus::AgainstSecondLaw as i32 == MOISTAIR_WHEEL_AGAINST_SECOND_LAW);
    assert!(CorrelationStatus::Within as i32 == MOISTAIR_CORRELATION_WITHIN);
    assert!(CorrelationStatus::OffStandardPressure as i32 == MOISTAIR_CORRELATION_OFF_STANDARD_PRESSURE);
};
