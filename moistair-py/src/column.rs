//! Numbers and arrays that come from Python, and arrays that go back.

use moistair_core::columns::{Column, NAN};
use numpy::{Element, PyArray1, PyArrayMethods, PyReadonlyArray1};
use pyo3::exceptions::{PyMemoryError, PyOverflowError};
use pyo3::prelude::*;
use pyo3::sync::PyOnceLock;
use pyo3::types::{PyFloat, PyInt, PyTuple};

/// A plain Python number; `None` for everything else, arrays without dimensions included.
pub fn plain_number(value: &Bound<'_, PyAny>) -> Option<PyResult<f64>> {
    (value.is_instance_of::<PyFloat>() || value.is_instance_of::<PyInt>()).then(|| value.extract())
}

/// Arguments of one call, broadcast to one shape by NumPy's rules.
pub struct Arguments<'py> {
    /// The common shape; empty for a call on plain numbers.
    pub shape: Vec<usize>,
    /// The product of the shape.
    pub rows: usize,
    inputs: Vec<Input<'py>>,
}

enum Input<'py> {
    Constant(f64),
    Rows(PyReadonlyArray1<'py, f64>),
}

impl<'py> Arguments<'py> {
    /// Reads named arguments.
    ///
    /// Layout, types and broadcasting are NumPy's own work, in `moistair._columns`: what comes back is contiguous, aligned,
    /// and without a copy where the argument was so already.
    pub fn read(py: Python<'py>, names: &[&str], values: &[Bound<'py, PyAny>]) -> PyResult<Self> {
        static BROADCAST: PyOnceLock<Py<PyAny>> = PyOnceLock::new();
        let broadcast = BROADCAST.import(py, "moistair._columns", "broadcast")?;
        let arguments = (PyTuple::new(py, names)?, PyTuple::new(py, values)?);
        let (shape, columns): (Vec<usize>, Vec<Bound<'py, PyAny>>) = broadcast.call1(arguments)?.extract()?;
        let rows = shape.iter().try_fold(1_usize, |rows, length| rows.checked_mul(*length));
        let rows = rows.ok_or_else(|| PyOverflowError::new_err("the common shape has too many elements"))?;
        let inputs = columns.iter().map(Input::read).collect::<PyResult<_>>()?;
        Ok(Self { shape, rows, inputs })
    }

    /// The inputs as columns of the core.
    pub fn columns(&self) -> PyResult<Vec<Column<'_>>> {
        self.inputs.iter().map(Input::column).collect()
    }
}

impl<'py> Input<'py> {
    fn read(value: &Bound<'py, PyAny>) -> PyResult<Self> {
        match plain_number(value) {
            Some(number) => Ok(Self::Constant(number?)),
            None => Ok(Self::Rows(value.cast::<PyArray1<f64>>()?.try_readonly().map_err(in_use)?)),
        }
    }

    fn column(&self) -> PyResult<Column<'_>> {
        Ok(match self {
            Self::Constant(value) => Column::constant(value),
            Self::Rows(array) => Column::new(array.as_slice()?),
        })
    }
}

/// An array that another call is writing to at this moment, or that is given twice where it is written to.
pub fn in_use(error: impl core::fmt::Display) -> PyErr {
    pyo3::exceptions::PyValueError::new_err(format!("array cannot be used here: {error}"))
}

/// A column to be filled.
pub fn blank<T: Copy>(rows: usize, value: T) -> PyResult<Vec<T>> {
    let mut column = Vec::new();
    column.try_reserve_exact(rows).map_err(|_| PyMemoryError::new_err("not enough memory for the result"))?;
    column.resize(rows, value);
    Ok(column)
}

/// A finished column as an array; its memory is handed over.
pub fn array<'py, T: Element>(py: Python<'py>, column: Vec<T>, shape: &[usize]) -> PyResult<Bound<'py, PyAny>> {
    let flat = PyArray1::from_vec(py, column);
    if shape.len() == 1 { Ok(flat.into_any()) } else { Ok(flat.reshape(shape.to_vec())?.into_any()) }
}

/// A function of one number on a number or on each of an array.
pub fn map<'py>(
    py: Python<'py>,
    name: &str,
    value: Bound<'py, PyAny>,
    function: impl Fn(f64) -> f64 + Sync,
) -> PyResult<Bound<'py, PyAny>> {
    if let Some(number) = plain_number(&value) {
        return Ok(PyFloat::new(py, function(number?)).into_any());
    }
    let arguments = Arguments::read(py, &[name], &[value])?;
    let columns = arguments.columns()?;
    let at = |row| columns.iter().find_map(|column| column.get(row)).unwrap_or(NAN);
    if arguments.shape.is_empty() {
        return Ok(PyFloat::new(py, function(at(0))).into_any());
    }
    let mut result = blank(arguments.rows, NAN)?;
    py.detach(|| result.iter_mut().enumerate().for_each(|(row, place)| *place = function(at(row))));
    array(py, result, &arguments.shape)
}
