//! What the tests share. The tests themselves stand in the folders beside: `published/` (check values with their sources),
//! `properties/`, `process/`, `conformance/` (three faces, same bits), `embedded/`.

#[path = "../../moistair-core/src/checks.rs"]
pub mod checks;
pub mod helmholtz_reference;
pub mod pairs;
#[path = "../../moistair-core/src/columns/process/tests/plausible.rs"]
pub mod plausible;
pub mod publications;
pub mod toolchain;
