//! The standard atmosphere.

use moistair_core::columns::NAN;
use moistair_core::{Error, Length, Pressure, Temperature};
use pyo3::prelude::*;
use pyo3::types::PyFloat;

use crate::column::{self, plain_number};
use crate::error::exception;

/// Pressure of the standard atmosphere (ISO 2533:1975) at an elevation.
///
/// A measured pressure is always better: weather moves it by ±3 %. A reading reduced to sea level is not the station's.
///
/// Parameters
/// ----------
/// elevation : float or array_like
///     Above mean sea level, m, −5000 to 11 000.
/// geometric : bool
///     Whether the elevation is geometric and is to be converted to geopotential altitude; by default it is taken as the latter,
///     as the handbook does (the pressure at 5 km is 0.05 % more then).
///
/// Returns
/// -------
/// float or numpy.ndarray
///     Pa; NaN where a row of an array is out of range.
///
/// Raises
/// ------
/// NotFiniteError, OutOfRangeError
///     A single elevation that has no value.
///
/// Examples
/// --------
/// >>> import moistair
/// >>> round(moistair.pressure_at_elevation(1600.0))
/// 83524
/// >>> moistair.pressure_at_elevation([0.0, 1600.0]).round()
/// array([101325.,  83524.])
#[pyfunction]
#[pyo3(signature = (elevation, *, geometric=false))]
pub fn pressure_at_elevation<'py>(
    py: Python<'py>,
    elevation: Bound<'py, PyAny>,
    geometric: bool,
) -> PyResult<Bound<'py, PyAny>> {
    let make = if geometric { Pressure::at_geometric_elevation } else { Pressure::at_elevation };
    map(py, "elevation", elevation, |meters| make(Length::from_meters(meters)).map(Pressure::pascals))
}

/// Temperature of the standard atmosphere (ISO 2533:1975) at an elevation: a mean of middle latitudes, no forecast.
///
/// Parameters
/// ----------
/// elevation : float or array_like
///     Above mean sea level, m, −5000 to 11 000.
/// geometric : bool
///     Whether the elevation is geometric; by default it is taken as geopotential altitude.
///
/// Returns
/// -------
/// float or numpy.ndarray
///     °C; NaN where a row of an array is out of range.
///
/// Raises
/// ------
/// NotFiniteError, OutOfRangeError
///     A single elevation that has no value.
///
/// Examples
/// --------
/// >>> import moistair
/// >>> moistair.temperature_at_elevation(2000.0)
/// 2.0
#[pyfunction]
#[pyo3(signature = (elevation, *, geometric=false))]
pub fn temperature_at_elevation<'py>(
    py: Python<'py>,
    elevation: Bound<'py, PyAny>,
    geometric: bool,
) -> PyResult<Bound<'py, PyAny>> {
    let make = if geometric { Temperature::at_geometric_elevation } else { Temperature::at_elevation };
    map(py, "elevation", elevation, |meters| make(Length::from_meters(meters)).map(Temperature::celsius))
}

/// The elevation at which the standard atmosphere (ISO 2533:1975) has a pressure: of a barometer, the pressure altitude, off the true
/// one by 250 m in strong weather.
///
/// Parameters
/// ----------
/// pressure : float or array_like
///     Absolute pressure, Pa, 22 632 (11 km) to 177 687 (−5 km).
/// geometric : bool
///     Whether the elevation is to be geometric; by default it is geopotential altitude.
///
/// Returns
/// -------
/// float or numpy.ndarray
///     Above mean sea level, m; NaN where a row of an array is out of range.
///
/// Raises
/// ------
/// NotFiniteError, OutOfRangeError
///     A single pressure that has no value.
///
/// Examples
/// --------
/// >>> import moistair
/// >>> round(moistair.elevation_at_pressure(moistair.pressure_at_elevation(1600.0)), 6)
/// 1600.0
#[pyfunction]
#[pyo3(signature = (pressure, *, geometric=false))]
pub fn elevation_at_pressure<'py>(
    py: Python<'py>,
    pressure: Bound<'py, PyAny>,
    geometric: bool,
) -> PyResult<Bound<'py, PyAny>> {
    let make = if geometric { Length::geometric_elevation_at_pressure } else { Length::elevation_at_pressure };
    map(py, "pressure", pressure, |pascals| make(Pressure::from_pascals(pascals)).map(Length::meters))
}

/// On a number, which raises where there is no value, or on each of an array, where NaN stands for none.
fn map<'py>(
    py: Python<'py>,
    name: &str,
    argument: Bound<'py, PyAny>,
    function: impl Fn(f64) -> Result<f64, Error> + Sync,
) -> PyResult<Bound<'py, PyAny>> {
    let scalar = |number| match function(number) {
        Ok(value) => Ok(PyFloat::new(py, value).into_any()),
        Err(error) => Err(exception(py, &error)),
    };
    if let Some(number) = plain_number(&argument) {
        return scalar(number?);
    }
    // The rows of an array cannot raise; a single number comes back to the scalar call.
    let result = column::map(py, name, argument.clone(), |number| function(number).unwrap_or(NAN))?;
    if result.is_instance_of::<PyFloat>() { scalar(argument.call_method0("__float__")?.extract()?) } else { Ok(result) }
}
