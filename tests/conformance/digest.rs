//! The committed digest of the seeded grid goes with the numerics version.

use std::fs;

use moistair_core::NUMERICS_VERSION;
use moistair_tests::toolchain::root;

use crate::grid;

/// Numbers may change only together with the version. To commit a new pair: raise `NUMERICS_VERSION`, state the largest change per
/// property in CHANGELOG.md, and run `MOISTAIR_WRITE_DIGEST=1 cargo test -p moistair-tests --test conformance digest`.
pub fn committed() {
    let path = root().join("tests/conformance/digest.txt");
    let computed = format!("numerics version {NUMERICS_VERSION}: {:016x}\n", grid::digest(grid::expected()));
    if std::env::var_os("MOISTAIR_WRITE_DIGEST").is_some() {
        fs::write(&path, &computed).unwrap();
    }
    let committed = fs::read_to_string(&path).unwrap();
    assert_eq!(computed, committed, "a result changed its bits: see tests/conformance/digest.rs for what to do");
}
