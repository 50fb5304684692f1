//! The standard atmosphere (ISO 2533) below 11 km: pressure and temperature at an elevation, and back.

use moistair_core::{Length, Pressure, Temperature};

use crate::memory::answer;
use crate::status::moistair_error;

/// Pressure of the standard atmosphere (ISO 2533) at an elevation, taken as geopotential altitude. A measured pressure is better: weather
/// moves it by 3 % either way.
///
/// elevation: [m] above mean sea level, -5000 to 11000; pressure: output [Pa]; error: may be null.
/// Returns 0, 101, 103, 201, 202.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_pressure_at_elevation(
    elevation: f64,
    pressure: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(Pressure::at_elevation(Length::from_meters(elevation))?.pascals());
    // SAFETY: the caller's pointers.
    unsafe { answer(pressure, error, call) }
}

/// Pressure of the standard atmosphere (ISO 2533) at a geometric elevation.
///
/// elevation: [m] above mean sea level, -5000 to 11000; pressure: output [Pa]; error: may be null.
/// Returns 0, 101, 103, 201, 202.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_pressure_at_geometric_elevation(
    elevation: f64,
    pressure: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(Pressure::at_geometric_elevation(Length::from_meters(elevation))?.pascals());
    // SAFETY: the caller's pointers.
    unsafe { answer(pressure, error, call) }
}

/// Temperature of the standard atmosphere (ISO 2533) at an elevation, taken as geopotential altitude: a mean of middle latitudes.
///
/// elevation: [m] above mean sea level, -5000 to 11000; temperature: output [°C]; error: may be null.
/// Returns 0, 101, 103, 201, 202.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_temperature_at_elevation(
    elevation: f64,
    temperature: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(Temperature::at_elevation(Length::from_meters(elevation))?.celsius());
    // SAFETY: the caller's pointers.
    unsafe { answer(temperature, error, call) }
}

/// Temperature of the standard atmosphere (ISO 2533) at a geometric elevation.
///
/// elevation: [m] above mean sea level, -5000 to 11000; temperature: output [°C]; error: may be null.
/// Returns 0, 101, 103, 201, 202.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_temperature_at_geometric_elevation(
    elevation: f64,
    temperature: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(Temperature::at_geometric_elevation(Length::from_meters(elevation))?.celsius());
    // SAFETY: the caller's pointers.
    unsafe { answer(temperature, error, call) }
}

/// The elevation, as geopotential altitude, at which the standard atmosphere (ISO 2533) has a pressure: of a barometer, the pressure
/// altitude.
///
/// pressure: [Pa], 22632 (11 km) to 177687 (-5 km); elevation: output [m] above mean sea level; error: may be null.
/// Returns 0, 101, 103, 201, 202.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_elevation_at_pressure(
    pressure: f64,
    elevation: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(Length::elevation_at_pressure(Pressure::from_pascals(pressure))?.meters());
    // SAFETY: the caller's pointers.
    unsafe { answer(elevation, error, call) }
}

/// The geometric elevation at which the standard atmosphere (ISO 2533) has a pressure.
///
/// pressure: [Pa], 22700 (11 km) to 177761 (-5 km); elevation: output [m] above mean sea level; error: may be null.
/// Returns 0, 101, 103, 201, 202.
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_geometric_elevation_at_pressure(
    pressure: f64,
    elevation: *mut f64,
    error: *mut moistair_error,
) -> i32 {
    let call = || Ok(Length::geometric_elevation_at_pressure(Pressure::from_pascals(pressure))?.meters());
    // SAFETY: the caller's pointers.
    unsafe { answer(elevation, error, call) }
}
