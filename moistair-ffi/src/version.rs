//! Versions.

/// Version of the interface in this header: changes when a program has to be compiled anew.
pub const MOISTAIR_ABI_VERSION: i32 = 1;

/// The MOISTAIR_ABI_VERSION that the library was built with. A program that finds another one than its header says must not go on.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_abi_version() -> i32 {
    MOISTAIR_ABI_VERSION
}

/// The version of the library as 1000000 major + 1000 minor + patch, as MOISTAIR_VERSION is of the header.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_version() -> i32 {
    const VERSION: i32 = 1_000_000 * number(env!("CARGO_PKG_VERSION_MAJOR"))
        + 1_000 * number(env!("CARGO_PKG_VERSION_MINOR"))
        + number(env!("CARGO_PKG_VERSION_PATCH"));
    VERSION
}

/// Changes when any result of any function changes in any bit.
#[unsafe(no_mangle)]
pub extern "C" fn moistair_numerics_version() -> i32 {
    const VERSION: i32 = moistair_core::NUMERICS_VERSION as i32;
    VERSION
}

#[allow(clippy::indexing_slicing, reason = "evaluated at compile time only")]
const fn number(digits: &str) -> i32 {
    let (digits, mut value, mut i) = (digits.as_bytes(), 0, 0);
    while i < digits.len() {
        assert!(digits[i].is_ascii_digit());
        value = 10 * value + (digits[i] - b'0') as i32;
        i += 1;
    }
    value
}
