//! Air-side economizer: whether outdoor air saves cooling, and how sure that is.
//!
//! Whatever is wrong with a reading, a setting or the clock, the decision is least outdoor air. The freeze lockout protects no
//! coil: only a hard-wired freezestat does. The least outdoor air is set by ventilation codes.

use core::ffi::c_char;
use core::mem::transmute;

use moistair_core::columns::NAN;
use moistair_core::process::economizer::{
    self, CoilLoad, Decision, Economizer, EconomizerState, Fallback, Reason, Rule, Supply,
};
use moistair_core::process::mixing::outdoor_air::FractionLimits;
use moistair_core::{DewPoint, Pressure, RelativeHumidity, TemperatureDifference};

use super::outdoor_air::{moistair_blend, moistair_measured_air};
use super::{celsius, enthalpy, finite};
use crate::memory::{Answer, answer, check, read, report, write};
use crate::quantity::quantity;
use crate::signal::{place, quality};
use crate::state::{moistair_basis, moistair_state};
use crate::status::{Failure, moistair_error};
use crate::text::{Text, texts};

/// Outdoor dry bulb not above the limit.
pub const MOISTAIR_ECONOMIZER_RULE_FIXED_DRY_BULB: i32 = 0;
/// Outdoor dry bulb not above that of the return air.
pub const MOISTAIR_ECONOMIZER_RULE_DIFFERENTIAL_DRY_BULB: i32 = 1;
/// Outdoor enthalpy not above the limit.
pub const MOISTAIR_ECONOMIZER_RULE_FIXED_ENTHALPY: i32 = 2;
/// Outdoor enthalpy not above that of the return air.
pub const MOISTAIR_ECONOMIZER_RULE_DIFFERENTIAL_ENTHALPY: i32 = 3;
/// Outdoor enthalpy and dry bulb not above their limits.
pub const MOISTAIR_ECONOMIZER_RULE_FIXED_ENTHALPY_AND_DRY_BULB: i32 = 4;
/// Outdoor enthalpy not above that of the return air, dry bulb not above its limit.
pub const MOISTAIR_ECONOMIZER_RULE_DIFFERENTIAL_ENTHALPY_AND_DRY_BULB: i32 = 5;
/// Outdoor dew point and dry bulb not above their limits.
pub const MOISTAIR_ECONOMIZER_RULE_DEW_POINT_AND_DRY_BULB: i32 = 6;
/// The coil takes no more out of outdoor air than out of return air.
pub const MOISTAIR_ECONOMIZER_RULE_LEAST_COIL_ENERGY: i32 = 7;

/// Least outdoor air when a humidity is missing.
pub const MOISTAIR_ECONOMIZER_FALLBACK_LEAST_OUTDOOR_AIR: i32 = 0;
/// Decide by dry bulb when a humidity is missing.
pub const MOISTAIR_ECONOMIZER_FALLBACK_DRY_BULB: i32 = 1;

/// On: outdoor air is favorable.
pub const MOISTAIR_ECONOMIZER_REASON_FAVORABLE: i32 = 0;
/// On: no longer favorable, but on for less than the least time.
pub const MOISTAIR_ECONOMIZER_REASON_LEAST_TIME_ON: i32 = 1;
/// Off: the outdoor dry bulb is too high.
pub const MOISTAIR_ECONOMIZER_REASON_DRY_BULB_HIGH: i32 = 2;
/// Off: the outdoor enthalpy is too high.
pub const MOISTAIR_ECONOMIZER_REASON_ENTHALPY_HIGH: i32 = 3;
/// Off: the outdoor dew point is too high.
pub const MOISTAIR_ECONOMIZER_REASON_DEW_POINT_HIGH: i32 = 4;
/// Off: outdoor air would cost the coil as much or more.
pub const MOISTAIR_ECONOMIZER_REASON_COIL_ENERGY_HIGH: i32 = 5;
/// Off: favorable, but not yet by the hysteresis.
pub const MOISTAIR_ECONOMIZER_REASON_WITHIN_HYSTERESIS: i32 = 6;
/// Off: favorable, but off for less than the least time.
pub const MOISTAIR_ECONOMIZER_REASON_LEAST_TIME_OFF: i32 = 7;
/// Off: outdoor air so cold that the dampers stay at their least.
pub const MOISTAIR_ECONOMIZER_REASON_FREEZE_LOCKOUT: i32 = 8;
/// Off: no usable outdoor dry bulb.
pub const MOISTAIR_ECONOMIZER_REASON_OUTDOOR_DRY_BULB_BAD: i32 = 9;
/// Off: no usable outdoor humidity, or none at this dry bulb.
pub const MOISTAIR_ECONOMIZER_REASON_OUTDOOR_HUMIDITY_BAD: i32 = 10;
/// Off: no usable return dry bulb.
pub const MOISTAIR_ECONOMIZER_REASON_RETURN_DRY_BULB_BAD: i32 = 11;
/// Off: no usable return humidity, or none at this dry bulb.
pub const MOISTAIR_ECONOMIZER_REASON_RETURN_HUMIDITY_BAD: i32 = 12;
/// Off: the settings make no sense; moistair_economizer_check says which.
pub const MOISTAIR_ECONOMIZER_REASON_SETTINGS_INVALID: i32 = 13;
/// Off: the time is no number or beyond 1e11 s.
pub const MOISTAIR_ECONOMIZER_REASON_CLOCK_INVALID: i32 = 14;

/// The settings of an economizer. Make them with moistair_economizer_new, then set what differs.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_economizer {
    /// Pressure of the site and formulation.
    pub basis: moistair_basis,
    /// Fixed limit of the outdoor dry bulb [°C].
    pub dry_bulb_limit: f64,
    /// Fixed limit of the outdoor enthalpy [J/kg].
    pub enthalpy_limit: f64,
    /// Fixed limit of the outdoor dew point [°C].
    pub dew_point_limit: f64,
    /// What the coil is to supply, for MOISTAIR_ECONOMIZER_RULE_LEAST_COIL_ENERGY: dry bulb [°C].
    pub supply_dry_bulb: f64,
    /// Relative humidity at which it leaves the air when it is wet [1].
    pub supply_coil_leaving: f64,
    /// By how much a dry bulb or dew point must be below its limit before it switches on [K]; it switches off at the limit.
    pub temperature_hysteresis: f64,
    /// The same of an enthalpy or a coil energy [J/kg].
    pub enthalpy_hysteresis: f64,
    /// Least time on [s]; a bad reading and the freeze lockout do not wait for it.
    pub least_time_on: f64,
    /// Least time off [s].
    pub least_time_off: f64,
    /// Below this outdoor dry bulb the dampers stay at their least [°C].
    pub freeze_limit: f64,
    /// MOISTAIR_ECONOMIZER_RULE_…
    pub rule: i32,
    /// When a humidity is missing: MOISTAIR_ECONOMIZER_FALLBACK_…
    pub fallback: i32,
}

/// What an economizer remembers from call to call. Zeroed at first: off; may be copied and stored, not looked into.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_economizer_state {
    /// Zero at first.
    pub words: [u64; 6],
}

/// What was decided. All numbers are finite, always.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_decision {
    /// How far the outdoor air is below what it must not exceed: positive speaks for outdoor air. 0 where nothing could be compared.
    pub margin: f64,
    /// Standard uncertainty of the margin by that of the readings.
    pub margin_uncertainty: f64,
    /// Probability that the air truly lies on the side that was decided for [1]; 0 where nothing could be compared.
    pub confidence: f64,
    /// 1 if outdoor air beyond the least may be taken, else 0.
    pub enabled: i32,
    /// Why, MOISTAIR_ECONOMIZER_REASON_…
    pub reason: i32,
    /// What the margin is a difference of: MOISTAIR_DRY_BULB, MOISTAIR_SPECIFIC_ENTHALPY, MOISTAIR_DEW_POINT or MOISTAIR_COIL_ENERGY.
    pub margin_quantity: i32,
    /// The worst quality of the readings that were used, MOISTAIR_QUALITY_…
    pub quality: i32,
    /// 1 if the dry bulbs alone decided, for want of a humidity; else 0.
    pub fallback: i32,
    /// 0.
    pub reserved: i32,
}

/// What a coil takes out of air.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_coil_load {
    /// Heat per mass of dry air, 0 or more [J/kg].
    pub heat: f64,
    /// 1 if water condenses, else 0.
    pub wet: i32,
    /// 0.
    pub reserved: i32,
}

impl moistair_economizer {
    fn to_core(self) -> Result<Economizer, Failure> {
        let rule = rule(self.rule)?;
        let fallback = Fallback::from_code(self.fallback).ok_or(Failure::UnknownSelector(self.fallback))?;
        Ok(Economizer {
            rule,
            basis: self.basis.to_core()?,
            dry_bulb_limit: celsius(self.dry_bulb_limit),
            enthalpy_limit: enthalpy(self.enthalpy_limit),
            dew_point_limit: DewPoint::from_celsius(self.dew_point_limit),
            supply: supply(self.supply_dry_bulb, self.supply_coil_leaving),
            temperature_hysteresis: TemperatureDifference::from_kelvins(self.temperature_hysteresis),
            enthalpy_hysteresis: enthalpy(self.enthalpy_hysteresis),
            least_time_on: self.least_time_on,
            least_time_off: self.least_time_off,
            freeze_limit: celsius(self.freeze_limit),
            fallback,
        })
    }

    /// Selectors that name nothing make settings that the core refuses.
    fn or_invalid(self) -> Economizer {
        self.to_core().unwrap_or_else(|_| Economizer::new(Rule::FixedDryBulb, Pressure::from_pascals(NAN)))
    }
}

impl From<Economizer> for moistair_economizer {
    fn from(settings: Economizer) -> Self {
        let basis = moistair_basis {
            pressure: settings.basis.pressure().pascals(),
            formulation: settings.basis.formulation().code(),
            reserved: 0,
        };
        Self {
            basis,
            dry_bulb_limit: settings.dry_bulb_limit.celsius(),
            enthalpy_limit: settings.enthalpy_limit.joules_per_kilogram(),
            dew_point_limit: settings.dew_point_limit.celsius(),
            supply_dry_bulb: settings.supply.dry_bulb.celsius(),
            supply_coil_leaving: settings.supply.coil_leaving.fraction(),
            temperature_hysteresis: settings.temperature_hysteresis.kelvins(),
            enthalpy_hysteresis: settings.enthalpy_hysteresis.joules_per_kilogram(),
            least_time_on: settings.least_time_on,
            least_time_off: settings.least_time_off,
            freeze_limit: settings.freeze_limit.celsius(),
            rule: settings.rule.code(),
            fallback: settings.fallback.code(),
        }
    }
}

impl Answer for moistair_economizer {
    fn is_finite(&self) -> bool {
        finite([self.basis.pressure, self.dry_bulb_limit, self.enthalpy_limit, self.dew_point_limit])
    }
}

impl moistair_economizer_state {
    fn to_core(self) -> EconomizerState {
        // SAFETY: a state is numbers without padding, and any bits are one.
        unsafe { transmute::<[u64; 6], EconomizerState>(self.words) }
    }
}

impl From<EconomizerState> for moistair_economizer_state {
    fn from(state: EconomizerState) -> Self {
        // SAFETY: as above.
        Self { words: unsafe { transmute::<EconomizerState, [u64; 6]>(state) } }
    }
}

impl From<Decision> for moistair_decision {
    fn from(decision: Decision) -> Self {
        Self {
            margin: decision.margin,
            margin_uncertainty: decision.margin_uncertainty,
            confidence: decision.confidence,
            enabled: decision.enabled.into(),
            reason: decision.reason.code(),
            margin_quantity: decision.margin_quantity.code(),
            quality: decision.quality.code(),
            fallback: decision.fallback.into(),
            reserved: 0,
        }
    }
}

impl moistair_decision {
    fn to_core(self) -> Result<Decision, Failure> {
        Ok(Decision {
            enabled: self.enabled != 0,
            reason: Reason::from_code(self.reason).ok_or(Failure::UnknownSelector(self.reason))?,
            margin: self.margin,
            margin_uncertainty: self.margin_uncertainty,
            margin_quantity: quantity(self.margin_quantity)?,
            confidence: self.confidence,
            quality: quality(self.quality)?,
            fallback: self.fallback != 0,
        })
    }
}

impl Answer for moistair_decision {
    fn is_finite(&self) -> bool {
        finite([self.margin, self.margin_uncertainty, self.confidence])
    }
}

impl From<CoilLoad> for moistair_coil_load {
    fn from(load: CoilLoad) -> Self {
        Self { heat: load.heat.joules_per_kilogram(), wet: load.wet.into(), reserved: 0 }
    }
}

impl Answer for moistair_coil_load {
    fn is_finite(&self) -> bool {
        self.heat.is_finite()
    }
}

fn rule(selector: i32) -> Result<Rule, Failure> {
    Rule::from_code(selector).ok_or(Failure::UnknownSelector(selector))
}

fn supply(dry_bulb: f64, coil_leaving: f64) -> Supply {
    Supply { dry_bulb: celsius(dry_bulb), coil_leaving: RelativeHumidity::from_fraction(coil_leaving) }
}

/// Usual settings of a rule at a site: the limits of ASHRAE 90.1 (from memory), a supply of 13 °C off a coil at 95 %, hysteresis of
/// 1 K and 1 kJ/kg, least times of 300 s, lockout below 0 °C, least outdoor air when a humidity is missing.
///
/// rule: MOISTAIR_ECONOMIZER_RULE_…; basis: pressure and formulation; settings: output; error: may be null.
/// Returns 0, 1xx, 2xx, 31x.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_economizer_new(
    rule: i32,
    basis: moistair_basis,
    settings: *mut moistair_economizer,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let made = Economizer::new(self::rule(rule)?, basis.to_core()?);
        made.check()?;
        Ok(made.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(settings, error, call) }
}

/// What is wrong with the settings, if anything.
///
/// settings: to be checked; error: may be null.
/// Returns 0 (in order), 1xx, 2xx, 31x.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_economizer_check(
    settings: *const moistair_economizer,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointer.
        unsafe { read(settings) }?.to_core()?.check()?;
        Ok(())
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

/// Decides whether outdoor air beyond the least may be taken, and remembers it. Whatever is wrong with settings, time or readings,
/// also selectors that name nothing: off, with the reason.
///
/// settings: of the economizer; state: its memory, read and written; time: [s] since any fixed instant; outdoor, returned: measured
/// air, read as far as the rule needs; decision: output; error: may be null.
/// Returns 0 (also for a bad reading), 101, 103.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_economizer_decide(
    settings: *const moistair_economizer,
    state: *mut moistair_economizer_state,
    time: f64,
    outdoor: *const moistair_measured_air,
    returned: *const moistair_measured_air,
    decision: *mut moistair_decision,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        check(decision)?;
        // SAFETY: the caller's pointers.
        let (settings, mut memory) = unsafe { (read(settings)?.or_invalid(), read(state)?.to_core()) };
        // SAFETY: the caller's pointers.
        let (outdoor, returned) = unsafe { (read(outdoor)?.or_refused(), read(returned)?.or_refused()) };
        let decided = moistair_decision::from(settings.decide(&mut memory, time, &outdoor, &returned));
        if !decided.is_finite() {
            return Err(Failure::Internal);
        }
        // SAFETY: the caller's pointers.
        unsafe {
            write(state, memory.into());
            write(decision, decided);
        }
        Ok(())
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

/// How much outdoor air to take by a decision: the least when off; when on, what mixes to the wanted temperature. Where that is
/// colder than both airs, outdoor air as far as the dampers go; where it is warmer than both, the nearest.
///
/// decision: as decided; outdoor, returned: states; wanted: mixed dry bulb [°C]; least, most: limits of the outdoor-air fraction
/// [1], the least by ventilation codes; blend: output; error: may be null.
/// Returns 0, 1xx, 2xx, 205, 206, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_economizer_outdoor_air(
    decision: *const moistair_decision,
    outdoor: *const moistair_state,
    returned: *const moistair_state,
    wanted: f64,
    least: f64,
    most: f64,
    blend: *mut moistair_blend,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let decision = unsafe { read(decision) }?.to_core()?;
        // SAFETY: the caller's pointers.
        let (outdoor, returned) = unsafe { (read(outdoor)?.to_core()?, read(returned)?.to_core()?) };
        let limits = FractionLimits { least, most };
        Ok(decision.outdoor_air(&outdoor, &returned, celsius(wanted), limits)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(blend, error, call) }
}

/// Heat that a coil has to take out of air to supply it: the larger of that of a dry and that of a wet coil, 0 where none is needed.
///
/// air: what enters; supply_dry_bulb: behind the coil [°C]; supply_coil_leaving: relative humidity at which a wet coil leaves the
/// air [1]; load: output; error: may be null.
/// Returns 0, 1xx, 2xx, 31x.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_economizer_coil_load(
    air: *const moistair_state,
    supply_dry_bulb: f64,
    supply_coil_leaving: f64,
    load: *mut moistair_coil_load,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointer.
        let air = unsafe { read(air) }?.to_core()?;
        Ok(economizer::coil_load(&air, supply(supply_dry_bulb, supply_coil_leaving))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(load, error, call) }
}

/// The fixed enthalpy limit at a pressure: that of air of 75 °F and 50 %, as ASHRAE 90.1 has it away from sea level (from memory).
///
/// basis: pressure and formulation; limit: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_economizer_enthalpy_limit(
    basis: moistair_basis,
    limit: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(economizer::enthalpy_limit(basis.to_core()?)?.joules_per_kilogram());
    // SAFETY: the caller's pointers.
    unsafe { answer(limit, error, call) }
}

/// The reason of a decision in words: static, lower case. Empty for an unknown code.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_economizer_reason_text(reason: i32) -> *const c_char {
    place(Reason::ALL.iter().position(|one| one.code() == reason), texts!(Reason, Text::new, text))
}

/// A rule in words: static, lower case. Empty for an unknown code.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_economizer_rule_text(rule: i32) -> *const c_char {
    place(Rule::ALL.iter().position(|one| one.code() == rule), texts!(Rule, Text::new, text))
}

const _: () = {
    assert!(size_of::<moistair_economizer>() == 104 && core::mem::offset_of!(moistair_economizer, rule) == 96);
    assert!(size_of::<moistair_economizer_state>() == size_of::<EconomizerState>());
    assert!(size_of::<moistair_decision>() == 48 && size_of::<moistair_coil_load>() == 16);
};
