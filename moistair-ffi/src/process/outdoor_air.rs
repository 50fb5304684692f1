//! How much of a mixture is outdoor air, with its uncertainty, and how much gives a wanted temperature.

use core::ffi::c_char;

use moistair_core::Quantity;
use moistair_core::columns::NAN;
use moistair_core::process::measured::{MeasuredAir, Reading};
use moistair_core::process::mixing::outdoor_air::{
    self, Blend, FractionLimits, FractionStatus, OtherFlow, OutdoorAirFraction, Reach,
};
use moistair_core::signal::Quality;

use super::stream::moistair_wet_stream;
use super::{celsius, finite};
use crate::memory::{Answer, answer, read};
use crate::quantity::quantity;
use crate::signal::{place, quality};
use crate::state::{moistair_basis, moistair_state};
use crate::status::{Failure, moistair_error};
use crate::text::{Text, texts};

/// As certain as was asked.
pub const MOISTAIR_FRACTION_DETERMINED: i32 = 0;
/// Less certain than was asked, or from a difference within twice its own uncertainty.
pub const MOISTAIR_FRACTION_UNCERTAIN: i32 = 1;
/// Below zero by more than twice its uncertainty: a sensor fault.
pub const MOISTAIR_FRACTION_BELOW_ZERO: i32 = 2;
/// Above one by more than twice its uncertainty: a sensor fault.
pub const MOISTAIR_FRACTION_ABOVE_ONE: i32 = 3;
/// Outdoor and return air read the same, or no air flows: any fraction would do.
pub const MOISTAIR_FRACTION_INDETERMINATE: i32 = 4;

/// The mixture has the wanted temperature.
pub const MOISTAIR_REACH_REACHED: i32 = 0;
/// At the least outdoor air: the nearest that the dampers allow, or held there by an economizer that is off.
pub const MOISTAIR_REACH_AT_LEAST: i32 = 1;
/// At the most outdoor air: the nearest that the dampers allow, or all of it where an economizer wants air colder than either.
pub const MOISTAIR_REACH_AT_MOST: i32 = 2;

/// The other flow is that of all the air: the supply air.
pub const MOISTAIR_FLOW_TOTAL: i32 = 0;
/// The other flow is what outdoor air mixes with: the recirculated air.
pub const MOISTAIR_FLOW_RECIRCULATED: i32 = 1;

/// A reading, its standard uncertainty and how far it can be trusted at all.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_reading {
    /// The value in the unit of the library; NaN when there is none.
    pub value: f64,
    /// One standard deviation, in the same unit, 0 or more. Of a reading that is stated as ± a, a / sqrt(3).
    pub standard_uncertainty: f64,
    /// MOISTAIR_QUALITY_…; a refused reading counts as missing, whatever its value is.
    pub quality: i32,
    /// Set to 0; not read.
    pub reserved: i32,
}

/// Air as a temperature and a humidity sensor see it.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_measured_air {
    /// Dry bulb [°C].
    pub dry_bulb: moistair_reading,
    /// The humidity, in the unit of its quantity.
    pub humidity: moistair_reading,
    /// What the humidity sensor measures: a selector that fixes a state, such as MOISTAIR_RELATIVE_HUMIDITY.
    pub humidity_quantity: i32,
    /// Set to 0; not read.
    pub reserved: i32,
}

/// A measured outdoor-air fraction.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_outdoor_air_fraction {
    /// Raw, not clamped to 0 … 1 [1]; NaN when indeterminate.
    pub fraction: f64,
    /// Its standard uncertainty [1]; NaN when indeterminate.
    pub standard_uncertainty: f64,
    /// What it is worth, MOISTAIR_FRACTION_…
    pub status: i32,
    /// The worst quality of the readings, MOISTAIR_QUALITY_…
    pub quality: i32,
}

/// An outdoor-air fraction and what it mixes.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_blend {
    /// The mixture: 1 kg/s of dry air.
    pub leaving: moistair_wet_stream,
    /// Outdoor-air fraction, within the limits [1].
    pub fraction: f64,
    /// Whether it has the wanted temperature, MOISTAIR_REACH_…
    pub reach: i32,
    /// 0.
    pub reserved: i32,
}

impl moistair_reading {
    pub(super) fn to_core(self) -> Result<Reading, Failure> {
        let quality = quality(self.quality)?;
        Ok(Reading { value: self.value, standard_uncertainty: self.standard_uncertainty, quality })
    }

    /// One whose quality is none is refused.
    pub(super) fn or_refused(self) -> Reading {
        self.to_core().unwrap_or(Reading { quality: Quality::Refused, ..Reading::missing() })
    }
}

impl moistair_measured_air {
    fn to_core(self) -> Result<MeasuredAir, Failure> {
        Ok(MeasuredAir {
            dry_bulb: self.dry_bulb.to_core()?,
            humidity: self.humidity.to_core()?,
            humidity_quantity: quantity(self.humidity_quantity)?,
        })
    }

    /// Readings of which the selectors name nothing are refused.
    pub(super) fn or_refused(self) -> MeasuredAir {
        let dry_bulb = self.dry_bulb.or_refused();
        match Quantity::from_code(self.humidity_quantity) {
            Some(humidity_quantity) => {
                MeasuredAir { dry_bulb, humidity: self.humidity.or_refused(), humidity_quantity }
            }
            None => MeasuredAir::from_dry_bulb(dry_bulb),
        }
    }
}

impl From<OutdoorAirFraction> for moistair_outdoor_air_fraction {
    fn from(found: OutdoorAirFraction) -> Self {
        Self {
            fraction: found.fraction.unwrap_or(NAN),
            standard_uncertainty: found.standard_uncertainty.unwrap_or(NAN),
            status: found.status.code(),
            quality: found.quality.code(),
        }
    }
}

impl Answer for moistair_outdoor_air_fraction {
    fn is_finite(&self) -> bool {
        self.status == MOISTAIR_FRACTION_INDETERMINATE || finite([self.fraction, self.standard_uncertainty])
    }
}

impl From<Blend> for moistair_blend {
    fn from(blend: Blend) -> Self {
        Self { leaving: blend.mixed.leaving.into(), fraction: blend.fraction, reach: blend.reach.code(), reserved: 0 }
    }
}

impl Answer for moistair_blend {
    fn is_finite(&self) -> bool {
        self.leaving.is_finite() && self.fraction.is_finite()
    }
}

/// The outdoor-air fraction (m - r) / (o - r) from readings of one quantity. Exact by enthalpy, humidity ratio and tracer; by dry
/// bulbs nearly, and wrong in fog.
///
/// quantity: MOISTAIR_DRY_BULB, MOISTAIR_HUMIDITY_RATIO, MOISTAIR_SPECIFIC_ENTHALPY or MOISTAIR_TRACER_CONCENTRATION; outdoor,
/// returned, mixed: readings; acceptable: standard uncertainty of the fraction up to which it counts as determined [1]; found:
/// output; error: may be null.
/// Returns 0 (also for a fraction that is worth nothing: its status says so), 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_outdoor_air_from_readings(
    quantity: i32,
    outdoor: *const moistair_reading,
    returned: *const moistair_reading,
    mixed: *const moistair_reading,
    acceptable: f64,
    found: *mut moistair_outdoor_air_fraction,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let quantity = self::quantity(quantity)?;
        // SAFETY: the caller's pointers.
        let [outdoor, returned, mixed] = unsafe { [read(outdoor)?, read(returned)?, read(mixed)?] };
        let (outdoor, returned, mixed) = (outdoor.to_core()?, returned.to_core()?, mixed.to_core()?);
        Ok(outdoor_air::from_readings(quantity, outdoor, returned, mixed, acceptable)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(found, error, call) }
}

/// The same from measured states, by enthalpy or humidity ratio, with the uncertainty that the sensors of temperature and humidity
/// leave in it.
///
/// quantity: MOISTAIR_HUMIDITY_RATIO or MOISTAIR_SPECIFIC_ENTHALPY; outdoor, returned, mixed: measured air without condensate;
/// basis: pressure and formulation; acceptable: standard uncertainty of the fraction up to which it counts as determined [1];
/// found: output; error: may be null.
/// Returns 0 (also for a fraction that is worth nothing: its status says so), 1xx, 2xx, 31x.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_outdoor_air_from_air(
    quantity: i32,
    outdoor: *const moistair_measured_air,
    returned: *const moistair_measured_air,
    mixed: *const moistair_measured_air,
    basis: moistair_basis,
    acceptable: f64,
    found: *mut moistair_outdoor_air_fraction,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (quantity, basis) = (self::quantity(quantity)?, basis.to_core()?);
        // SAFETY: the caller's pointers.
        let [outdoor, returned, mixed] = unsafe { [read(outdoor)?, read(returned)?, read(mixed)?] };
        let (outdoor, returned, mixed) = (outdoor.to_core()?, returned.to_core()?, mixed.to_core()?);
        Ok(outdoor_air::from_air(quantity, &outdoor, &returned, &mixed, basis, acceptable)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(found, error, call) }
}

/// The outdoor-air fraction from measured dry-air flows.
///
/// outdoor: [kg/s]; other: [kg/s]; other_is: MOISTAIR_FLOW_TOTAL or MOISTAIR_FLOW_RECIRCULATED; acceptable: standard uncertainty of
/// the fraction up to which it counts as determined [1]; found: output; error: may be null.
/// Returns 0 (also for a fraction that is worth nothing: its status says so), 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_outdoor_air_from_flows(
    outdoor: *const moistair_reading,
    other: *const moistair_reading,
    other_is: i32,
    acceptable: f64,
    found: *mut moistair_outdoor_air_fraction,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (outdoor, other) = unsafe { (read(outdoor)?.to_core()?, read(other)?.to_core()?) };
        let other = match other_is {
            MOISTAIR_FLOW_TOTAL => OtherFlow::Total(other),
            MOISTAIR_FLOW_RECIRCULATED => OtherFlow::Recirculated(other),
            _ => return Err(Failure::UnknownSelector(other_is)),
        };
        Ok(outdoor_air::from_flows(outdoor, other, acceptable)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(found, error, call) }
}

/// The outdoor-air fraction that mixes to a wanted temperature, or comes nearest to it within the limits, with moisture and fog.
///
/// outdoor, returned: states; wanted: mixed dry bulb [°C]; least, most: limits of the fraction [1]; blend: output; error: may be null.
/// Returns 0, 1xx, 2xx, 205, 206, 301.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_outdoor_air_for_temperature(
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
        let (outdoor, returned) = unsafe { (read(outdoor)?.to_core()?, read(returned)?.to_core()?) };
        let limits = FractionLimits { least, most };
        Ok(outdoor_air::for_mixed_temperature(&outdoor, &returned, celsius(wanted), limits)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(blend, error, call) }
}

/// What a fraction is worth in words: static, lower case. Empty for an unknown code.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_fraction_status_text(status: i32) -> *const c_char {
    place(FractionStatus::ALL.iter().position(|one| one.code() == status), texts!(FractionStatus, Text::new, text))
}

const _: () = {
    assert!(size_of::<moistair_reading>() == 24 && size_of::<moistair_measured_air>() == 56);
    assert!(size_of::<moistair_outdoor_air_fraction>() == 24 && size_of::<moistair_blend>() == 160);
    assert!(FractionStatus::Indeterminate.code() == MOISTAIR_FRACTION_INDETERMINATE);
    assert!(Reach::AtMost.code() == MOISTAIR_REACH_AT_MOST);
};
