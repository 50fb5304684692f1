//! What the tests share. The tests themselves stand in the folders beside: `published/` (check values with their sources),
//! `properties/`, `process/`, `conformance/` (three faces, same bits), `embedded/`.

pub mod toolchain;
