//! What the structures that a caller owns have in common: equality, copies, pickle.

use pyo3::exceptions::{PyRuntimeError, PyTypeError, PyValueError};
use pyo3::prelude::*;
use pyo3::types::{PyBytes, PyDict};

use moistair_core::columns::Column;
use moistair_core::signal::Quality;

use crate::column::{Arguments, plain_number};
use crate::memory::{self, Plain};

/// Declares the methods of a class around a structure of the core, and adds those that all of them have.
macro_rules! owned {
    ($name:ident, { $($items:tt)* }) => {
        #[pymethods]
        impl $name {
            $($items)*

            fn __eq__(&self, other: &Self) -> bool {
                self.0 == other.0
            }

            fn __copy__(&self) -> Self {
                Self(self.0)
            }

            fn __deepcopy__(&self, _memo: &Bound<'_, PyAny>) -> Self {
                Self(self.0)
            }

            fn __reduce__<'py>(&self, py: Python<'py>) -> PyResult<(Bound<'py, PyAny>, $crate::owned::Parts<'py>)> {
                $crate::owned::reduce(py, stringify!($name), &self.0)
            }
        }
    };
}
pub(crate) use owned;

/// Class, byte order and bytes.
pub type Parts<'py> = (&'static str, &'static str, Bound<'py, PyBytes>);

pub fn reduce<'py, T: Plain>(
    py: Python<'py>,
    class: &'static str,
    value: &T,
) -> PyResult<(Bound<'py, PyAny>, Parts<'py>)> {
    let restore = py.import("moistair._core")?.getattr("restore_owned")?;
    Ok((restore, (class, BYTE_ORDER, PyBytes::new(py, memory::bytes(value)))))
}

const BYTE_ORDER: &str = if cfg!(target_endian = "little") { "little" } else { "big" };

/// The structure in bytes that `reduce` wrote.
pub fn restored<T: Plain>(byte_order: &str, bytes: &[u8]) -> PyResult<T> {
    if byte_order != BYTE_ORDER {
        return Err(PyValueError::new_err("pickled on a machine with another byte order"));
    }
    memory::from_bytes(bytes).ok_or_else(|| PyValueError::new_err("pickled by a version with another layout"))
}

/// A member of an enumeration of a Python module, by its code.
pub fn member<'py>(py: Python<'py>, module: &str, name: &str, code: i32) -> PyResult<Bound<'py, PyAny>> {
    py.import(module)?.getattr(name)?.call1((code,))
}

/// Something with a code, from an integer or a member of an enumeration.
pub fn coded<T>(value: i32, from_code: impl Fn(i32) -> Option<T>, what: &str) -> PyResult<T> {
    from_code(value).ok_or_else(|| PyValueError::new_err(format!("{value} is no {what}")))
}

/// Samples in time: the rows of one column after the other.
pub struct Samples<'py>(Arguments<'py>);

impl<'py> Samples<'py> {
    /// `None` when all are plain numbers: one sample.
    pub fn read(py: Python<'py>, names: &[&str], values: &[Bound<'py, PyAny>]) -> PyResult<Option<Self>> {
        if values.iter().all(|value| plain_number(value).is_some()) {
            return Ok(None);
        }
        let arguments = Arguments::read(py, names, values)?;
        match arguments.shape.len() {
            0 => Ok(None),
            1 => Ok(Some(Self(arguments))),
            _ => Err(PyValueError::new_err(format!(
                "samples follow each other in one dimension, not {:?}",
                arguments.shape
            ))),
        }
    }

    pub fn len(&self) -> usize {
        self.0.rows
    }

    pub fn columns<const N: usize>(&self) -> PyResult<[Column<'_>; N]> {
        let columns = self.0.columns()?;
        columns.try_into().map_err(|_| PyRuntimeError::new_err("internal error of moistair: number of columns"))
    }
}

/// The qualities of a column of codes; refused before anything is done with them.
pub fn qualities(column: &Column<'_>, rows: usize) -> PyResult<()> {
    let good = (0..rows).all(|row| column.get(row).and_then(quality_code).is_some());
    if good { Ok(()) } else { Err(PyValueError::new_err("quality holds a number that is no quality")) }
}

/// The quality that a number of a column stands for.
pub fn quality_code(value: f64) -> Option<Quality> {
    let code = value as i32;
    if (f64::from(code) - value).abs() > 0.0 || value.is_nan() { None } else { Quality::from_code(code) }
}

/// Keywords that make an object again.
pub fn keywords<'py>(py: Python<'py>, pairs: &[(&str, Bound<'py, PyAny>)]) -> PyResult<Bound<'py, PyDict>> {
    let dict = PyDict::new(py);
    for (name, value) in pairs {
        dict.set_item(name, value)?;
    }
    Ok(dict)
}

/// An argument that is a plain number, for calls on one sample.
pub fn number(value: &Bound<'_, PyAny>) -> PyResult<f64> {
    value.extract().map_err(|_| PyTypeError::new_err("a number is expected"))
}
