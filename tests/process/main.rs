//! Processes: worked examples with their sources, laws that hold everywhere, facts of the trade, hostile inputs.
//!
//! `MOISTAIR_CASES` sets how many random cases each law is tried on (the full form is 10000).
#![allow(missing_docs)]

#[path = "../../moistair-core/src/checks.rs"]
#[allow(dead_code)]
mod checks;
mod coil_march;
mod coils;
mod compression;
mod desiccants;
mod economizer;
mod facts;
mod hostile;
mod hostile_sequences;
mod humidifiers;
mod laws;
mod outdoor_air;
mod rooms;
mod sequences;
mod support;
mod towers;
mod worked_examples;
