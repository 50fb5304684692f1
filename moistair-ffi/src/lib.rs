//! The C interface of moistair.
//!
//! Conventions, the same for every function:
//! - Functions that can fail return a status: 0 (`MOISTAIR_OK`), 1xx for an argument, 2xx for a value
//!   out of range, 3xx for no result, 9xx for a fault of the library.
//! - SI units with °C; fractions, never percent; energies and volumes per kilogram of dry air.
//! - Structures are plain values of the caller. Inputs come first, then outputs, then an optional place for the detail of
//!   an error. Outputs are written only when the status is 0, except where a function says otherwise.
//! - Selectors are integers and are checked, as are null and misaligned pointers. What a structure holds is checked too: any
//!   bits are taken, none make a call panic, hang, or return NaN with status 0.
//! - Nothing is allocated, no state is kept between calls, no text is formatted. Functions may be called from any thread at any
//!   time, as long as two calls do not write to one structure.
//!
//! # Safety
//! A pointer is null or points to as many valid elements as the function says, and what it points to is not changed by another
//! thread during the call. That is all that the functions trust the caller with.
#![cfg_attr(not(feature = "std"), no_std)]
#![allow(non_camel_case_types, reason = "the types carry their names in C")]
#![allow(clippy::missing_safety_doc, reason = "the contract is one for all functions, at the top of the crate")]
#![allow(
    rustdoc::broken_intra_doc_links,
    reason = "[s] and the like are units, not links; the text goes to the header"
)]

pub mod account;
pub mod at_pressure;
pub mod atmosphere;
pub mod columns;
pub mod derivatives;
mod memory;
pub mod process;
pub mod psychrometer;
pub mod quantity;
pub mod signal;
pub mod state;
pub mod status;
mod text;
pub mod version;

pub use account::*;
pub use at_pressure::*;
pub use atmosphere::*;
pub use columns::*;
pub use derivatives::*;
pub use process::*;
pub use psychrometer::*;
pub use quantity::*;
pub use signal::*;
pub use state::*;
pub use status::*;
pub use version::*;

#[cfg(all(feature = "panic-handler", not(feature = "std")))]
mod handler {
    /// Never reached; a target without an operating system has nothing better to do than to wait for its watchdog.
    #[panic_handler]
    fn panic(_: &core::panic::PanicInfo) -> ! {
        loop {
            core::hint::spin_loop();
        }
    }
}

#[cfg(all(feature = "panic-proof", not(feature = "std")))]
mod handler {
    unsafe extern "C" {
        /// Defined nowhere.
        fn moistair_proof_a_panic_is_reachable() -> !;
    }

    #[panic_handler]
    fn panic(_: &core::panic::PanicInfo) -> ! {
        // SAFETY: never linked, see above.
        unsafe { moistair_proof_a_panic_is_reachable() }
    }
}

/// An export that can panic, to show that the proof finds it.
#[cfg(feature = "planted-panic")]
#[unsafe(no_mangle)]
#[allow(clippy::indexing_slicing, reason = "the purpose of this function")]
pub extern "C" fn moistair_planted_panic(place: usize) -> i32 {
    [1, 2, 3][place]
}
