//! Errors of the core as Python exceptions.

use moistair_core::{Error, Quantity};
use pyo3::exceptions::PyRuntimeError;
use pyo3::prelude::*;
use pyo3::sync::PyOnceLock;

/// The name of a quantity as a Python identifier.
pub fn identifier(quantity: Quantity) -> String {
    quantity.name().replace([' ', '-'], "_")
}

/// The exception for an error.
pub fn exception(py: Python<'_>, error: &Error) -> PyErr {
    exception_at(py, error, "")
}

/// The exception for an error, whose text begins with the place where it arose.
pub fn exception_at(py: Python<'_>, error: &Error, place: &str) -> PyErr {
    let (value, minimum, maximum) = match error.value_and_limits() {
        Some((value, minimum, maximum)) => (Some(value), Some(minimum), Some(maximum)),
        None => (None, None, None),
    };
    let text = format!("{place}{error}");
    from_parts(py, (error.code(), text, error.quantity().map(identifier), value, minimum, maximum))
}

type Parts = (i32, String, Option<String>, Option<f64>, Option<f64>, Option<f64>);

/// `moistair._errors` chooses the class by the code.
fn from_parts(py: Python<'_>, parts: Parts) -> PyErr {
    static FROM_PARTS: PyOnceLock<Py<PyAny>> = PyOnceLock::new();
    let made = FROM_PARTS.import(py, "moistair._errors", "from_parts").and_then(|make| make.call1(parts));
    made.map_or_else(|failure| failure, PyErr::from_value)
}

/// A name that is none of those it may be.
pub fn unknown_name(py: Python<'_>, text: String) -> PyErr {
    from_parts(py, (102, text, None, None, None, None))
}

/// An attribute name that is no property of a state.
pub fn no_property(py: Python<'_>, name: &str) -> PyErr {
    unknown_name(py, format!("{name} is no property of a state; moistair.PROPERTIES lists them"))
}

/// A name that does not fix a state beside dry bulb and pressure.
pub fn unknown_second(py: Python<'_>, name: &str) -> PyErr {
    unknown_name(py, format!("{name} does not fix a state beside dry_bulb and pressure"))
}

/// Something that this layer should have ruled out; never a panic.
pub fn internal(reason: impl core::fmt::Display) -> PyErr {
    PyRuntimeError::new_err(format!("internal error of moistair: {reason}"))
}
