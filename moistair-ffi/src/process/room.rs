//! Rooms: gains, supply, the line of the room, and the reheat that it takes.
//!
//! Supply air colder than a space's dew point wets its outlets, moist ducts grow mould: hygiene rules and local codes govern. Codes restrict
//! simultaneous heating and cooling.

use moistair_core::columns::NAN;
use moistair_core::process::reheat::{self, CoilLeaving};
use moistair_core::process::room::{
    self, Conditioned, LeastReheat, LimitingLine, MoistureSource, ReheatCause, RoomAir, RoomDewPoints, RoomGains,
};
use moistair_core::{HeatFlow, RelativeHumidity, Temperature};

use super::reheat::moistair_reheat;
use super::stream::{moistair_exchange, moistair_stream, moistair_wet_stream};
use super::{celsius, enthalpy, finite, mass_flow};
use crate::memory::{Answer, answer, read};
use crate::state::{moistair_basis, moistair_state};
use crate::status::{Failure, moistair_error};

/// Moisture comes as saturated vapor of a temperature [°C], 0 to 200.
pub const MOISTAIR_SOURCE_SATURATED_VAPOR: i32 = 0;
/// Moisture comes as liquid water of a temperature [°C], 0 to 200, which the heat of the room evaporates.
pub const MOISTAIR_SOURCE_LIQUID: i32 = 1;
/// Moisture comes with a stated enthalpy [J/kg].
pub const MOISTAIR_SOURCE_ENTHALPY: i32 = 2;

/// A coil leaves air of a relative humidity.
pub const MOISTAIR_COIL_LEAVES_RELATIVE_HUMIDITY: i32 = 0;
/// A coil leaves a mixture of air that passed untouched and air saturated at the apparatus dew point.
pub const MOISTAIR_COIL_LEAVES_BYPASS: i32 = 1;

/// A room needs no reheat.
pub const MOISTAIR_REHEAT_NOT_NEEDED: i32 = 0;
/// The line of the room misses what any setting of the coil leaves.
pub const MOISTAIR_REHEAT_LINE_MISSES_COIL: i32 = 1;
/// The line of the room would meet the coil below the coldest that the coil can hold.
pub const MOISTAIR_REHEAT_COLDEST_COIL: i32 = 2;

/// What a room gives to its air.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_room_gains {
    /// Heat that comes without water [W]; negative in a room that loses heat.
    pub sensible: f64,
    /// Water [kg/s]; negative where it is taken out.
    pub moisture: f64,
    /// Temperature [°C] or enthalpy [J/kg] of that water.
    pub source_value: f64,
    /// How the water comes: MOISTAIR_SOURCE_…
    pub source: i32,
    /// 0.
    pub reserved: i32,
}

impl moistair_room_gains {
    pub(super) fn to_core(self) -> Result<RoomGains, Failure> {
        Ok(RoomGains {
            sensible: HeatFlow::from_watts(self.sensible),
            moisture: mass_flow(self.moisture),
            source: source(self.source, self.source_value)?,
        })
    }
}

impl Answer for moistair_room_gains {
    fn is_finite(&self) -> bool {
        finite([self.sensible, self.moisture, self.source_value])
    }
}

fn source(selector: i32, value: f64) -> Result<MoistureSource, Failure> {
    match selector {
        MOISTAIR_SOURCE_SATURATED_VAPOR => Ok(MoistureSource::SaturatedVapor(celsius(value))),
        MOISTAIR_SOURCE_LIQUID => Ok(MoistureSource::Liquid(celsius(value))),
        MOISTAIR_SOURCE_ENTHALPY => Ok(MoistureSource::Enthalpy(enthalpy(value))),
        _ => Err(Failure::UnknownSelector(selector)),
    }
}

/// A room and the air that is supplied to it.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_room_air {
    /// The air that is supplied.
    pub supply: moistair_stream,
    /// The air of the room, which leaves it; with fog, if the gains are more than the air holds.
    pub room: moistair_wet_stream,
    /// The gains.
    pub exchange: moistair_exchange,
}

impl From<RoomAir> for moistair_room_air {
    fn from(done: RoomAir) -> Self {
        Self { supply: done.supply.into(), room: done.room.into(), exchange: done.exchange.into() }
    }
}

impl Answer for moistair_room_air {
    fn is_finite(&self) -> bool {
        self.supply.is_finite() && self.room.is_finite() && self.exchange.is_finite()
    }
}

/// Where the line of a room meets saturation: nowhere, once, or twice.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_room_dew_points {
    /// The warmer meeting, which is the coil's [°C]; NaN for a line that misses saturation: such a room needs reheat.
    pub warmer: f64,
    /// The colder, where the line comes out of saturation again [°C]; NaN where it does not down to -40 °C.
    pub colder: f64,
    /// Number of meetings: 0, 1 or 2.
    pub count: i32,
    /// 0.
    pub reserved: i32,
}

impl From<RoomDewPoints> for moistair_room_dew_points {
    fn from(found: RoomDewPoints) -> Self {
        let part = |met: Option<Temperature>| met.map_or(NAN, Temperature::celsius);
        let count = i32::from(found.warmer.is_some()) + i32::from(found.colder.is_some());
        Self { warmer: part(found.warmer), colder: part(found.colder), count, reserved: 0 }
    }
}

impl Answer for moistair_room_dew_points {
    fn is_finite(&self) -> bool {
        self.count == 0 || self.warmer.is_finite()
    }
}

/// What a cooling coil can leave, whatever its control.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_coil_leaving {
    /// Relative humidity of the leaving air [1], 0.2 to 1; or the bypass factor [1], 0 to below 1.
    pub fraction: f64,
    /// The coldest apparatus dew point that the coil can hold [°C], -40 to 150; read for MOISTAIR_COIL_LEAVES_BYPASS only.
    pub coldest: f64,
    /// MOISTAIR_COIL_LEAVES_RELATIVE_HUMIDITY or MOISTAIR_COIL_LEAVES_BYPASS.
    pub kind: i32,
    /// 0.
    pub reserved: i32,
}

impl moistair_coil_leaving {
    fn to_core(self) -> Result<CoilLeaving, Failure> {
        match self.kind {
            MOISTAIR_COIL_LEAVES_RELATIVE_HUMIDITY => {
                Ok(CoilLeaving::RelativeHumidity(RelativeHumidity::from_fraction(self.fraction)))
            }
            MOISTAIR_COIL_LEAVES_BYPASS => {
                Ok(CoilLeaving::Bypass { factor: self.fraction, coldest: celsius(self.coldest) })
            }
            other => Err(Failure::UnknownSelector(other)),
        }
    }
}

/// The steepest line through a room that a coil still serves without reheat.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_limiting_line {
    /// Its sensible heat ratio [1]: below it reheat is unavoidable.
    pub sensible_heat_ratio: f64,
    /// Its slope, change of enthalpy over change of humidity ratio [J/kg].
    pub slope: f64,
    /// Where it touches the curve of the coil: temperature of the leaving air, or the apparatus dew point of a coil with bypass [°C].
    pub touches: f64,
    /// 1 if the coldest that the coil can hold binds, 0 if the curvature of saturation does.
    pub at_coldest: i32,
    /// 0.
    pub reserved: i32,
}

impl From<LimitingLine> for moistair_limiting_line {
    fn from(limit: LimitingLine) -> Self {
        Self {
            sensible_heat_ratio: limit.sensible_heat_ratio,
            slope: limit.slope.joules_per_kilogram(),
            touches: limit.touches.celsius(),
            at_coldest: i32::from(limit.at_coldest),
            reserved: 0,
        }
    }
}

impl Answer for moistair_limiting_line {
    fn is_finite(&self) -> bool {
        finite([self.sensible_heat_ratio, self.slope, self.touches])
    }
}

/// The least reheat of a room, over all flows of supply air.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_least_reheat {
    /// The supply behind the heater, at the flow with the least reheat.
    pub supply: moistair_stream,
    /// The air that leaves the coil.
    pub coil_leaving: moistair_state,
    /// The limit of the room.
    pub limit: moistair_limiting_line,
    /// Heat of the heater [W]; 0 where none is needed.
    pub reheat: f64,
    /// MOISTAIR_REHEAT_NOT_NEEDED, MOISTAIR_REHEAT_LINE_MISSES_COIL or MOISTAIR_REHEAT_COLDEST_COIL.
    pub cause: i32,
    /// 0.
    pub reserved: i32,
}

impl From<LeastReheat> for moistair_least_reheat {
    fn from(least: LeastReheat) -> Self {
        Self {
            supply: least.supply.into(),
            coil_leaving: least.coil_leaving.into(),
            limit: least.limit.into(),
            reheat: least.reheat.watts(),
            cause: least.cause as i32,
            reserved: 0,
        }
    }
}

impl Answer for moistair_least_reheat {
    fn is_finite(&self) -> bool {
        self.supply.is_finite() && self.coil_leaving.is_finite() && self.limit.is_finite() && finite([self.reheat])
    }
}

/// A room and the coil and heater that keep it.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_conditioned {
    /// The room and its supply.
    pub room: moistair_room_air,
    /// Coil and heater, whose leaving air is the supply.
    pub reheat: moistair_reheat,
}

impl From<Conditioned> for moistair_conditioned {
    fn from(done: Conditioned) -> Self {
        Self { room: done.room.into(), reheat: done.reheat.into() }
    }
}

impl Answer for moistair_conditioned {
    fn is_finite(&self) -> bool {
        self.room.is_finite() && self.reheat.is_finite()
    }
}

/// The flow and the humidity ratio of supply air of a given temperature.
///
/// room: the state of the room; gains: what the room gives to the air; supply_temperature: [°C], -80 to 150; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (such air would have to flow backwards or without end, be drier than dry or more than saturated).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_supply_at_temperature(
    room: *const moistair_state,
    gains: *const moistair_room_gains,
    supply_temperature: f64,
    done: *mut moistair_room_air,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (room, gains) = unsafe { (read(room)?.to_core()?, read(gains)?.to_core()?) };
        Ok(room::supply_at_temperature(&room, &gains, celsius(supply_temperature))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The supply air of a given dry-air flow.
///
/// room: the state of the room; gains: what the room gives to the air; dry_air_flow: [kg/s], 0 to 1e6; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207 (no flow), 301 (so little air would have to be drier than dry, or the supply would be fog).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_supply_at_flow(
    room: *const moistair_state,
    gains: *const moistair_room_gains,
    dry_air_flow: f64,
    done: *mut moistair_room_air,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (room, gains) = unsafe { (read(room)?.to_core()?, read(gains)?.to_core()?) };
        Ok(room::supply_at_flow(&room, &gains, mass_flow(dry_air_flow))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The room that a supply and the gains make.
///
/// supply: the stream that is supplied; gains: what the room gives to it; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207 (no flow), 301 (more water is taken out than there is; outside the range of states).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_of_supply(
    supply: *const moistair_stream,
    gains: *const moistair_room_gains,
    done: *mut moistair_room_air,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (supply, gains) = unsafe { (read(supply)?.to_core()?, read(gains)?.to_core()?) };
        Ok(room::room_of_supply(&supply, &gains)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// The gains of a room, from supply and room air.
///
/// supply: the stream that is supplied; room: the state of the room; source: how its moisture comes, MOISTAIR_SOURCE_…; source_value:
/// temperature [°C] or enthalpy [J/kg] of that moisture; gains: output; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_gains_between(
    supply: *const moistair_stream,
    room: *const moistair_state,
    source: i32,
    source_value: f64,
    gains: *mut moistair_room_gains,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (supply, room) = unsafe { (read(supply)?.to_core()?, read(room)?.to_core()?) };
        let found = room::gains_between(&supply, &room, self::source(source, source_value)?)?;
        Ok(moistair_room_gains {
            sensible: found.sensible.watts(),
            moisture: found.moisture.kilograms_per_second(),
            source_value,
            source,
            reserved: 0,
        })
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(gains, error, call) }
}

/// The latent heat by which a room's gains are told apart: the enthalpy of the vapor in its own air.
///
/// room: the state of the room; latent_heat: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_latent_heat(
    room: *const moistair_state,
    latent_heat: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        Ok(room::latent_heat(&unsafe { read(room) }?.to_core()?).joules_per_kilogram())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(latent_heat, error, call) }
}

/// Sensible over total gain by moistair_room_latent_heat; below 0 or above 1 where one gain is negative or water evaporates in the room.
///
/// room: the state of the room; gains: what the room gives to the air; sensible_heat_ratio: output [1]; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the gains cancel, or there are none).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_sensible_heat_ratio(
    room: *const moistair_state,
    gains: *const moistair_room_gains,
    sensible_heat_ratio: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (room, gains) = unsafe { (read(room)?.to_core()?, read(gains)?.to_core()?) };
        Ok(room::sensible_heat_ratio(&room, &gains)?)
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(sensible_heat_ratio, error, call) }
}

/// Slope of the line of a room, change of enthalpy over change of humidity ratio.
///
/// gains: what the room gives to the air; basis: pressure and formulation; slope: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (no moisture: the slope has no bound).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_process_slope(
    gains: *const moistair_room_gains,
    basis: moistair_basis,
    slope: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let gains = unsafe { read(gains) }?.to_core()?;
        Ok(room::process_slope(&gains, basis.to_core()?)?.joules_per_kilogram())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(slope, error, call) }
}

/// Slope of the line of a sensible heat ratio through a room.
///
/// room: the state of the room; sensible_heat_ratio: [1]; slope: output [J/kg]; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (a ratio of one, whose slope has no bound).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_slope_of_ratio(
    room: *const moistair_state,
    sensible_heat_ratio: f64,
    slope: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let room = unsafe { read(room) }?.to_core()?;
        Ok(room::slope_of_ratio(&room, sensible_heat_ratio)?.joules_per_kilogram())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(slope, error, call) }
}

/// Sensible heat ratio of a slope through a room.
///
/// room: the state of the room; slope: [J/kg]; sensible_heat_ratio: output [1]; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (a slope of zero).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_ratio_of_slope(
    room: *const moistair_state,
    slope: f64,
    sensible_heat_ratio: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let room = unsafe { read(room) }?.to_core()?;
        Ok(room::ratio_of_slope(&room, enthalpy(slope))?)
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(sensible_heat_ratio, error, call) }
}

/// The apparatus dew points of a room that is cooled: where the line of its supply states meets saturation. Not for a room that liquid water cools
/// (a ratio below 0): its line runs the other way.
///
/// room: the state of the room; sensible_heat_ratio: [1] by moistair_room_latent_heat; found: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (a room of a dew point below -40 °C).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_apparatus_dew_points(
    room: *const moistair_state,
    sensible_heat_ratio: f64,
    found: *mut moistair_room_dew_points,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let room = unsafe { read(room) }?.to_core()?;
        Ok(room::apparatus_dew_points(&room, sensible_heat_ratio)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(found, error, call) }
}

/// The limit of a room: the steepest line that a coil still serves without reheat.
///
/// room: the state of the room; entering: the state that enters the coil, of account with a bypass; coil: what the coil can leave; limit: output;
/// error: may be null.
/// Returns 0, 1xx, 2xx, 301 (the coil cannot get as dry as the room, or cannot cool it).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_limiting_line(
    room: *const moistair_state,
    entering: *const moistair_state,
    coil: *const moistair_coil_leaving,
    limit: *mut moistair_limiting_line,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (room, entering, coil) =
            unsafe { (read(room)?.to_core()?, read(entering)?.to_core()?, read(coil)?.to_core()?) };
        Ok(room::limiting_line(&room, &entering, coil)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(limit, error, call) }
}

/// The least reheat with which coil and heater keep a room, over all flows of supply air.
///
/// room: the state of the room; gains: what the room gives to the air; entering: the state that enters the coil, of account with a bypass; coil: what
/// the coil can leave; least: output; error: may be null.
/// Returns 0, 1xx, 2xx, 301 (no moisture to take out; the coil cannot get as dry as the room, or cannot cool it).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_least_reheat(
    room: *const moistair_state,
    gains: *const moistair_room_gains,
    entering: *const moistair_state,
    coil: *const moistair_coil_leaving,
    least: *mut moistair_least_reheat,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let (room, gains, entering, coil) = unsafe {
            (read(room)?.to_core()?, read(gains)?.to_core()?, read(entering)?.to_core()?, read(coil)?.to_core()?)
        };
        Ok(room::least_reheat(&room, &gains, &entering, coil)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(least, error, call) }
}

/// What coil and heater have to do to the air that enters them so that a room is kept at a state.
///
/// room: the state of the room; gains: what the room gives to the air; entering: the stream that enters the coil, of the flow of the supply; coil: what
/// the coil can leave; condensate: where the condensate temperature comes from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150,
/// read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error: may be null.
/// Returns 0, 1xx, 2xx, 207 (no flow), 301 (as moistair_room_supply_at_flow and moistair_reheat_with_coil).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_room_conditioned(
    room: *const moistair_state,
    gains: *const moistair_room_gains,
    entering: *const moistair_stream,
    coil: *const moistair_coil_leaving,
    condensate: i32,
    condensate_temperature: f64,
    done: *mut moistair_conditioned,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let condensate = super::coil::condensate(condensate, condensate_temperature)?;
        // SAFETY: the caller's pointers.
        let (room, gains, entering, coil) = unsafe {
            (read(room)?.to_core()?, read(gains)?.to_core()?, read(entering)?.to_core()?, read(coil)?.to_core()?)
        };
        Ok(room::conditioned(&room, &gains, &entering, coil, condensate)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

/// Reaches a state by cooling to its humidity ratio on the characteristic of a coil, then heating. Codes restrict simultaneous heating and
/// cooling.
///
/// entering: the stream that enters; target: the state to reach; coil: what the coil can leave; condensate: where the condensate temperature comes
/// from, MOISTAIR_CONDENSATE_AT_…; condensate_temperature: [°C], -40 to 150, read for MOISTAIR_CONDENSATE_AT_GIVEN only; done: output; error:
/// may be null.
/// Returns 0, 1xx, 2xx, 301 (the quantity of the error says what binds: the target is moister; the bypass is too large; the apparatus dew point
/// lies below the coldest; the target is cooler than what the coil leaves).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_reheat_with_coil(
    entering: *const moistair_stream,
    target: *const moistair_state,
    coil: *const moistair_coil_leaving,
    condensate: i32,
    condensate_temperature: f64,
    done: *mut moistair_reheat,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let condensate = super::coil::condensate(condensate, condensate_temperature)?;
        // SAFETY: the caller's pointers.
        let (entering, target, coil) =
            unsafe { (read(entering)?.to_core()?, read(target)?.to_core()?, read(coil)?.to_core()?) };
        Ok(reheat::with_coil(&entering, &target, coil, condensate)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(done, error, call) }
}

const _: () = {
    assert!(size_of::<moistair_room_gains>() == 32 && size_of::<moistair_room_air>() == 280);
    assert!(size_of::<moistair_room_dew_points>() == 24 && size_of::<moistair_coil_leaving>() == 24);
    assert!(size_of::<moistair_limiting_line>() == 32 && size_of::<moistair_least_reheat>() == 264);
    assert!(size_of::<moistair_conditioned>() == 720);
    assert!(ReheatCause::NotNeeded as i32 == MOISTAIR_REHEAT_NOT_NEEDED);
    assert!(ReheatCause::LineMissesCoil as i32 == MOISTAIR_REHEAT_LINE_MISSES_COIL);
    assert!(ReheatCause::ColdestCoil as i32 == MOISTAIR_REHEAT_COLDEST_COIL);
};
