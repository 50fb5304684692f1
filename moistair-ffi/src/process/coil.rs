//! Cooling coils.

use moistair_core::columns::NAN;
use moistair_core::process::coil::{self, Apparatus, ApparatusDewPoints, CoilRegime, CondensateTemperature, Cooling};

use super::stream::{moistair_exchange, moistair_stream};
use super::{celsius, finite, ratio};
use crate::memory::{Answer, answer, read};
use crate::state::moistair_state;
use crate::status::{Failure, moistair_error};

/// Condensate leaves at the temperature of the leaving air.
pub const MOISTAIR_CONDENSATE_AT_LEAVING_AIR: i32 = 0;
/// Condensate leaves at the apparatus dew point: the given one, or that of the line from the entering to the leaving air.
pub const MOISTAIR_CONDENSATE_AT_APPARATUS: i32 = 1;
/// Condensate leaves at a given temperature.
pub const MOISTAIR_CONDENSATE_AT_GIVEN: i32 = 2;

/// No water condensed.
pub const MOISTAIR_COIL_DRY: i32 = 0;
/// Water condensed as liquid.
pub const MOISTAIR_COIL_WET: i32 = 1;
/// The coil is cold enough for frost.
pub const MOISTAIR_COIL_FROST: i32 = 2;
/// Water condensed as liquid on a part of the surface.
pub const MOISTAIR_COIL_PARTLY_WET: i32 = 3;

/// What a cooling coil did.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_cooling {
    /// The air that enters, as the books have it.
    pub entering: moistair_stream,
    /// The air that leaves.
    pub leaving: moistair_stream,
    /// Heat and water into the air, both negative for a wet coil.
    pub exchange: moistair_exchange,
    /// Heat taken from the air, positive [W].
    pub cooling_load: f64,
    /// Sensible part of the load [W].
    pub sensible: f64,
    /// Latent part of the load [W].
    pub latent: f64,
    /// Condensate, positive [kg/s].
    pub condensate: f64,
    /// Sensible part over the load [1]; NaN without a load.
    pub sensible_heat_ratio: f64,
    /// MOISTAIR_COIL_DRY, MOISTAIR_COIL_WET, MOISTAIR_COIL_FROST or MOISTAIR_COIL_PARTLY_WET.
    pub regime: i32,
    /// 0.
    pub reserved: i32,
}

impl From<Cooling> for moistair_cooling {
    fn from(done: Cooling) -> Self {
        Self {
            entering: done.entering.into(),
            leaving: done.leaving.into(),
            exchange: done.exchange.into(),
            cooling_load: done.cooling_load.watts(),
            sensible: done.sensible.watts(),
            latent: done.latent.watts(),
            condensate: done.condensate.kilograms_per_second(),
            sensible_heat_ratio: done.sensible_heat_ratio().unwrap_or(NAN),
            regime: done.regime as i32,
            reserved: 0,
        }
    }
}

impl Answer for moistair_cooling {
    fn is_finite(&self) -> bool {
        let parts = [self.cooling_load, self.sensible, self.latent, self.condensate];
        self.entering.is_finite() && self.leaving.is_finite() && self.exchange.is_finite() && finite(parts)
    }
}

/// A coil by its bypass.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_apparatus {
    /// Where the line from the entering through the leaving air meets saturation [°C].
    pub dew_point: f64,
    /// The share of the air that seems to pass untouched [1]; 0 for air that leaves saturated.
    pub bypass_factor: f64,
}

impl From<Apparatus> for moistair_apparatus {
    fn from(apparatus: Apparatus) -> Self {
        Self { dew_point: apparatus.dew_point.celsius(), bypass_factor: apparatus.bypass_factor }
    }
}

impl Answer for moistair_apparatus {
    fn is_finite(&self) -> bool {
        finite([self.dew_point, self.bypass_factor])
    }
}

/// Where the line from the entering through the leaving air meets saturation: nowhere, once, or twice.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_apparatus_dew_points {
    /// The warmer meeting, which is the coil's; NaN for a line that misses saturation.
    pub warmer: moistair_apparatus,
    /// The colder, where the line comes out of saturation again; NaN where it does not down to -40 °C.
    pub colder: moistair_apparatus,
    /// Where the line comes nearest to saturation, if it misses it; otherwise the warmer meeting [°C].
    pub nearest: f64,
    /// Number of meetings: 0, 1 or 2.
    pub count: i32,
    /// 0.
    pub reserved: i32,
}

impl From<ApparatusDewPoints> for moistair_apparatus_dew_points {
    fn from(found: ApparatusDewPoints) -> Self {
        let none = moistair_apparatus { dew_point: NAN, bypass_factor: NAN };
        let part = |met: Option<Apparatus>| met.map_or(none, Into::into);
        Self {
            warmer: part(found.warmer),
            colder: part(found.colder),
            nearest: found.nearest.celsius(),
            count: i32::from(found.warmer.is_some()) + i32::from(found.colder.is_some()),
            reserved: 0,
        }
    }
}

impl Answer for moistair_apparatus_dew_points {
    fn is_finite(&self) -> bool {
        self.nearest.is_finite()
    }
}

pub(super) fn condensate(selector: i32, temperature: f64) -> Result<CondensateTemperature, Failure> {
    match selector {
        MOISTAIR_CONDENSATE_AT_LEAVING_AIR => Ok(CondensateTemperature::LeavingAir),
        MOISTAIR_CONDENSATE_AT_APPARATUS => Ok(CondensateTemperature::Apparatus),
        MOISTAIR_CONDENSATE_AT_GIVEN => Ok(CondensateTemperature::Given(celsius(temperature))),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

/// A cooling coil that leaves a given state.
///
/// entering: the stream that enters; leaving: the state that leaves; condensate: where the condensate temperature comes from,
/// MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may
/// be null.
/// Returns 0, 1xx, 2xx, 301 (the leaving air is warmer or moister; no apparatus dew point for MOISTAIR_CONDENSATE_AT_APPARATUS).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_to_state(
    entering: *const moistair_stream,
    leaving: *const moistair_state,
    condensate: i32,
    condensate_temperature: f64,
    done: *mut moistair_cooling,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let condensate = self::condensate(condensate, condensate_temperature)?;
        // SAFETY: the caller's pointers.
        Ok(coil::to_state(&unsafe { read(entering) }?.to_core()?, &unsafe { read(leaving) }?.to_core()?, condensate)?
            .into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// A cooling coil known by its apparatus dew point and bypass factor.
///
/// entering: the stream that enters; apparatus_dew_point: [°C], -40 to 150; bypass_factor: [1], 0 to 1; condensate: where the condensate
/// temperature comes from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only;
/// done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the apparatus is warmer than the air).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_by_bypass_factor(
    entering: *const moistair_stream,
    apparatus_dew_point: f64,
    bypass_factor: f64,
    condensate: i32,
    condensate_temperature: f64,
    done: *mut moistair_cooling,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, condensate) =
            (unsafe { read(entering) }?.to_core()?, self::condensate(condensate, condensate_temperature)?);
        Ok(coil::by_bypass_factor(&entering, celsius(apparatus_dew_point), bypass_factor, condensate)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The coil between two measured states. Differences of humidity ratio within a dead band count as noise of the sensors: the air then keeps
/// the humidity ratio that it enters with, and only what it cannot hold at the leaving temperature condenses.
///
/// entering: the stream that enters; leaving: the state that leaves; condensate: where the condensate temperature comes from,
/// MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only; dead_band: [kg/kg], 0 to
/// 10; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the leaving air is moister by more than the dead band; no apparatus dew point for
/// MOISTAIR_CONDENSATE_AT_APPARATUS).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_between(
    entering: *const moistair_stream,
    leaving: *const moistair_state,
    condensate: i32,
    condensate_temperature: f64,
    dead_band: f64,
    done: *mut moistair_cooling,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let condensate = self::condensate(condensate, condensate_temperature)?;
        // SAFETY: the caller's pointers.
        Ok(coil::between(
            &unsafe { read(entering) }?.to_core()?,
            &unsafe { read(leaving) }?.to_core()?,
            condensate,
            ratio(dead_band),
        )?
        .into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The apparatus dew point and bypass factor that take the entering to the leaving air: the inverse of moistair_coil_by_bypass_factor.
///
/// entering: the state that enters; leaving: the state that leaves; apparatus: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (nothing condenses, the air leaves warmer, or the line misses saturation: such a state takes a coil and
/// reheat).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_apparatus_dew_point(
    entering: *const moistair_state,
    leaving: *const moistair_state,
    apparatus: *mut moistair_apparatus,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(coil::apparatus_dew_point(&unsafe { read(entering) }?.to_core()?, &unsafe { read(leaving) }?.to_core()?)?
            .into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(apparatus, error, call) }
}

/// All meetings of the line from the entering through the leaving air with saturation, below the leaving air's dry bulb.
///
/// entering: the state that enters; leaving: the state that leaves; found: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (nothing condenses, or the air leaves warmer).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_apparatus_dew_points(
    entering: *const moistair_state,
    leaving: *const moistair_state,
    found: *mut moistair_apparatus_dew_points,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (entering, leaving) = unsafe { (read(entering)?.to_core()?, read(leaving)?.to_core()?) };
        Ok(coil::apparatus_dew_points(&entering, &leaving)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(found, error, call) }
}

/// The bypass factor of a number of equal rows, one behind the other.
///
/// of_one_row: bypass factor of one of them [1], 0 to 1; rows: how many; bypass_factor: output [1]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_coil_bypass_factor_of_rows(
    of_one_row: f64,
    rows: u32,
    bypass_factor: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    // SAFETY: the caller's pointers.
    unsafe { answer(bypass_factor, error, || Ok(coil::bypass_factor_of_rows(of_one_row, rows)?)) }
}

const _: () = {
    assert!(size_of::<moistair_apparatus>() == 16);
    assert!(size_of::<moistair_cooling>() == 296 && core::mem::offset_of!(moistair_cooling, regime) == 288);
    assert!(CoilRegime::Dry as i32 == MOISTAIR_COIL_DRY && CoilRegime::Frost as i32 == MOISTAIR_COIL_FROST);
    assert!(CoilRegime::Wet as i32 == MOISTAIR_COIL_WET && CoilRegime::PartlyWet as i32 == MOISTAIR_COIL_PARTLY_WET);
    assert!(size_of::<moistair_apparatus_dew_points>() == 48);
};
