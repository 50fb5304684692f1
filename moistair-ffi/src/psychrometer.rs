//! The psychrometer: a state from its reading, and back.

use moistair_core::{Bulb, MoistAir, Psychrometer, PsychrometerReading, Temperature};

use crate::memory::{answer, read};
use crate::state::{moistair_basis, moistair_state};
use crate::status::{Failure, moistair_error};

/// The wetted bulb is covered with water, supercooled below the melting temperature.
pub const MOISTAIR_BULB_WATER: i32 = 0;
/// The wetted bulb is covered with ice.
pub const MOISTAIR_BULB_ICE: i32 = 1;

/// Coefficient of an aspirated psychrometer over water at 0 °C [1/K]: WMO-No. 8 (from memory). It holds for 3 to 5 m/s over shielded bulbs.
pub const MOISTAIR_ASPIRATED_OVER_WATER: f64 = 6.53e-4;
/// Coefficient of an aspirated psychrometer over ice [1/K]: WMO-No. 8 (from memory).
pub const MOISTAIR_ASPIRATED_OVER_ICE: f64 = 5.75e-4;

fn psychrometer(bulb: i32, coefficient: f64) -> Result<Psychrometer, Failure> {
    let bulb = Bulb::from_code(bulb).ok_or(Failure::UnknownSelector(bulb))?;
    Ok(Psychrometer::with_coefficient(bulb, coefficient)?)
}

/// A state from what a psychrometer shows, by the equation of WMO-No. 8, x_w p = x_ws(t_w) p - A p (t - t_w), over water with
/// A (1 + 0.000944 t_w), and the saturation of the formulation. Its wet bulb is not the thermodynamic one. An ice bulb may read above the dry
/// bulb, where the vapor is supersaturated over ice.
///
/// dry_bulb: [°C], -80 to 150; wet_bulb: [°C], -40 to 100; bulb: MOISTAIR_BULB_WATER or MOISTAIR_BULB_ICE, one must look; coefficient: A [1/K],
/// 0.0003 to 0.002, MOISTAIR_ASPIRATED_OVER_WATER or MOISTAIR_ASPIRATED_OVER_ICE for an aspirated instrument; basis: pressure and formulation;
/// state: output; error: may be null.
/// Returns 0, 101, 102, 103, 201, 202, 203 (negative vapor, more than the air holds, ice above its melting temperature; the error holds the
/// limits here), 31x (no reading is possible: colder than -40 °C, or too warm for ice).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_from_psychrometer(
    dry_bulb: f64,
    wet_bulb: f64,
    bulb: i32,
    coefficient: f64,
    basis: moistair_basis,
    state: *mut moistair_state,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let celsius = Temperature::from_celsius;
        let reading = PsychrometerReading { dry_bulb: celsius(dry_bulb), wet_bulb: celsius(wet_bulb) };
        Ok(MoistAir::from_psychrometer(psychrometer(bulb, coefficient)?, reading, basis.to_core()?)?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(state, error, call) }
}

/// What the wetted bulb of a psychrometer would show in a state: the inverse of moistair_from_psychrometer.
///
/// state: a state; bulb: MOISTAIR_BULB_WATER or MOISTAIR_BULB_ICE; coefficient: [1/K], 0.0003 to 0.002; wet_bulb: output [°C]; error: may be
/// null.
/// Returns 0, 101, 102, 103, 201, 202, 203, 31x (the wet bulb would lie outside -40 to 100 °C, ice melt, or water boil).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_psychrometer_reading(
    state: *const moistair_state,
    bulb: i32,
    coefficient: f64,
    wet_bulb: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let air = unsafe { read(state) }?.to_core()?;
        Ok(air.psychrometer_reading(psychrometer(bulb, coefficient)?)?.wet_bulb.celsius())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(wet_bulb, error, call) }
}

const _: () = assert!(Bulb::Water.code() == MOISTAIR_BULB_WATER && Bulb::Ice.code() == MOISTAIR_BULB_ICE);
