//! The Python face: arguments in, results out, no formula.

mod account;
mod atmosphere;
mod column;
mod derivatives;
mod economizer;
mod error;
mod memory;
mod owned;
mod process;
mod signal;
mod state;

use pyo3::prelude::*;

/// The compiled part of the package `moistair`.
#[pymodule]
mod _core {
    use pyo3::prelude::*;

    #[pymodule_export]
    use crate::account::{
        BooksTotal, Counts, Deviation, Period, Periods, Residuals, Sum, Total, restore_owned, restore_period,
    };
    #[pymodule_export]
    use crate::atmosphere::{elevation_at_pressure, pressure_at_elevation, temperature_at_elevation};
    #[pymodule_export]
    use crate::economizer::{
        EconomizerState, economizer_check, economizer_codes, economizer_decide, economizer_default,
    };
    #[pymodule_export]
    use crate::process::{process_table, run, run_sequence};
    #[pymodule_export]
    use crate::signal::{
        Channel, ChannelState, Checked, CheckedColumns, code_table, from_core, restore_checked, to_core,
    };
    #[pymodule_export]
    use crate::state::{MoistAir, limits, quantity_table, restore_state};

    #[pymodule_init]
    fn init(module: &Bound<'_, PyModule>) -> PyResult<()> {
        module.add("MAX_STEPS", moistair_core::columns::MAX_STEPS)?;
        module.add("MAX_STREAMS", moistair_core::columns::MAX_STREAMS)?;
        module.add("NUMERICS_VERSION", moistair_core::NUMERICS_VERSION)?;
        module.add("__version__", env!("CARGO_PKG_VERSION"))
    }
}
