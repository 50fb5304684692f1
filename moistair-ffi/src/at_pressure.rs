//! The same air at another pressure.

use moistair_core::{Pressure, Temperature, saturation_temperature_after};

use crate::memory::{answer, read};
use crate::quantity::quantity;
use crate::state::{moistair_basis, moistair_state};
use crate::status::moistair_error;

/// The same air, with the same humidity ratio, at another pressure and temperature.
///
/// state: a state; dry_bulb: [°C]; pressure: absolute [Pa]; changed: output, may be state itself; error: may be
/// null.
/// Returns 0, 101, 102, 103, 201, 202, 203 (water would condense; the error holds the humidity ratio at saturation there).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_at_temperature_and_pressure(
    state: *const moistair_state,
    dry_bulb: f64,
    pressure: f64,
    changed: *mut moistair_state,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let air = unsafe { read(state) }?.to_core()?;
        let dry_bulb = Temperature::from_celsius(dry_bulb);
        Ok(air.at_temperature_and_pressure(dry_bulb, Pressure::from_pascals(pressure))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(changed, error, call) }
}

/// The same air, with the same humidity ratio and temperature, at another pressure.
///
/// state: a state; pressure: absolute [Pa]; changed: output, may be state itself; error: may be null.
/// Returns 0, 101, 102, 103, 201, 202, 203 (water would condense; the error holds the humidity ratio at saturation there).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_at_pressure(
    state: *const moistair_state,
    pressure: f64,
    changed: *mut moistair_state,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let air = unsafe { read(state) }?.to_core()?;
        Ok(air.at_pressure(Pressure::from_pascals(pressure))?.into())
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(changed, error, call) }
}

/// Dew or frost point of the air of a state at another pressure: the pressure dew point of a line, or the atmospheric one of air in it. Above
/// the temperature there it says that water condenses.
///
/// state: a state; property: MOISTAIR_DEW_POINT or MOISTAIR_FROST_POINT; pressure: absolute [Pa]; temperature: output [°C];
/// error: may be null.
/// Returns 0, 101, 102, 103, 201, 202, 203, 31x (dry air, or outside -40 to 200 °C over liquid, -100 °C to melting over ice).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_saturation_temperature_at(
    state: *const moistair_state,
    property: i32,
    pressure: f64,
    temperature: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        // SAFETY: the caller's pointers.
        let air = unsafe { read(state) }?.to_core()?;
        Ok(air.saturation_temperature_at(quantity(property)?, Pressure::from_pascals(pressure))?)
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(temperature, error, call) }
}

/// Dew or frost point after a change of pressure: from a pressure dew point to the atmospheric one, or back.
///
/// property: what is given, MOISTAIR_DEW_POINT or MOISTAIR_FROST_POINT; value: its value [°C]; basis: pressure that it belongs to, and
/// formulation; wanted: MOISTAIR_DEW_POINT or MOISTAIR_FROST_POINT; pressure: the other, absolute [Pa]; temperature: output
/// [°C]; error: may be null.
/// Returns 0, 101, 102, 103, 201, 202, 31x (ice above its melting temperature, water above boiling, or the result out of its range).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_saturation_temperature_after(
    property: i32,
    value: f64,
    basis: moistair_basis,
    wanted: i32,
    pressure: f64,
    temperature: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        let (given, wanted, pressure) = (quantity(property)?, quantity(wanted)?, Pressure::from_pascals(pressure));
        Ok(saturation_temperature_after(given, value, basis.to_core()?, wanted, pressure)?)
    };
    // SAFETY: the caller's pointers.
    unsafe { answer(temperature, error, call) }
}
