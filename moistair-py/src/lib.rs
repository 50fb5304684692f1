//! The Python face: arguments in, results out, no formula.

mod column;
mod error;
mod state;

use pyo3::prelude::*;

/// The compiled part of the package `moistair`.
#[pymodule]
mod _core {
    use pyo3::prelude::*;

    #[pymodule_export]
    use crate::state::{MoistAir, pressure_at_elevation, quantity_table, restore_state};

    #[pymodule_init]
    fn init(module: &Bound<'_, PyModule>) -> PyResult<()> {
        module.add("NUMERICS_VERSION", moistair_core::NUMERICS_VERSION)?;
        module.add("__version__", env!("CARGO_PKG_VERSION"))
    }
}
