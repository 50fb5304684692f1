//! Partial derivatives of the properties of states.

use moistair_core::columns::NAN;
use moistair_core::{MoistAir as Air, PropertyDerivatives, Quantity};
use pyo3::prelude::*;
use pyo3::sync::PyOnceLock;
use pyo3::types::{PyDict, PyString};

use crate::column;
use crate::error::exception;
use crate::state::States;

type Parts<T> = [T; 4];

fn parts(of: PropertyDerivatives) -> Parts<f64> {
    [of.value, of.by_dry_bulb, of.by_second, of.by_pressure]
}

/// `moistair._derivatives.PropertyDerivatives`.
fn record<'py, T: IntoPyObject<'py>>(py: Python<'py>, parts: Parts<T>) -> PyResult<Bound<'py, PyAny>> {
    static CLASS: PyOnceLock<Py<PyAny>> = PyOnceLock::new();
    let [value, by_dry_bulb, by_second, by_pressure] = parts;
    CLASS.import(py, "moistair._derivatives", "PropertyDerivatives")?.call1((
        value,
        by_dry_bulb,
        by_second,
        by_pressure,
    ))
}

/// Of one state: floats, or what is wrong with the first that has none.
pub fn of_one<'py>(
    py: Python<'py>,
    air: &Air,
    names: &[Bound<'py, PyString>],
    quantities: Vec<Quantity>,
    second: Quantity,
) -> PyResult<Bound<'py, PyDict>> {
    let mut all = Vec::with_capacity(quantities.len());
    air.derivatives_of(quantities, second, |_, derivatives| all.push(derivatives))
        .map_err(|error| exception(py, &error))?;
    let result = PyDict::new(py);
    for (name, derivatives) in names.iter().zip(all) {
        result.set_item(name, record(py, parts(derivatives.map_err(|error| exception(py, &error))?))?)?;
    }
    Ok(result)
}

/// Of many: arrays, NaN where a row has no derivatives.
pub fn of_many<'py>(
    py: Python<'py>,
    states: &States,
    names: &[Bound<'py, PyString>],
    quantities: &[Quantity],
    second: Quantity,
) -> PyResult<Bound<'py, PyDict>> {
    let rows = states.status.len();
    let blank = || -> PyResult<Parts<Vec<f64>>> {
        Ok([column::blank(rows, NAN)?, column::blank(rows, NAN)?, column::blank(rows, NAN)?, column::blank(rows, NAN)?])
    };
    let mut all = quantities.iter().map(|_| blank()).collect::<PyResult<Vec<_>>>()?;
    py.detach(|| {
        for row in 0..rows {
            let Some(air) = states.row(row) else { continue };
            let mut columns = all.iter_mut();
            // A second property without a value here leaves the row as it is.
            let _ = air.derivatives_of(quantities.iter().copied(), second, |_, derivatives| {
                let (Some(columns), Ok(derivatives)) = (columns.next(), derivatives) else { return };
                for (column, part) in columns.iter_mut().zip(parts(derivatives)) {
                    if let Some(place) = column.get_mut(row) {
                        *place = part;
                    }
                }
            });
        }
    });
    let result = PyDict::new(py);
    for (name, columns) in names.iter().zip(all) {
        let [value, by_dry_bulb, by_second, by_pressure] =
            columns.map(|values| column::array(py, values, &states.shape));
        result.set_item(name, record(py, [value?, by_dry_bulb?, by_second?, by_pressure?])?)?;
    }
    Ok(result)
}
