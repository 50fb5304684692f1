//! The bytes of structures of the core, for pickle. The only unsafe code of this crate.

use core::mem::{MaybeUninit, size_of};

use moistair_core::process::economizer;
use moistair_core::{account, signal};

/// A structure of numbers only, without padding, of which any bits are a valid value.
///
/// # Safety
/// All three must hold.
pub unsafe trait Plain: Copy {
    /// The sum of the sizes of all fields; equal to the size of the structure when there is no padding.
    const FIELDS: usize;
}

macro_rules! plain {
    ($($type:ty, $fields:expr;)*) => {$(
        // SAFETY: the structure is `repr(C)` and documented as numbers only, owned by the caller as plain memory; its size is
        // that of its fields, so that there is no padding.
        unsafe impl Plain for $type {
            const FIELDS: usize = $fields;
        }
        const _: () = assert!(size_of::<$type>() == <$type as Plain>::FIELDS);
    )*};
}

const SUM: usize = 2 * 8;
const CLOCK: usize = 2 * 8 + 2 * 4;
const TOTAL: usize = 2 * SUM + 4 * 8 + 3 * 8 + CLOCK + 2 * 4;
const RESIDUALS: usize = 2 * SUM + 3 * 8;

plain! {
    signal::ChannelState, CLOCK + 7 * 8 + 4 * 4;
    economizer::EconomizerState, CLOCK + 8 + 4 * 4;
    account::Sum, SUM;
    account::Total, TOTAL;
    account::Periods, TOTAL + 2 * 8;
    account::Counts, (account::QUALITY_SLOTS + 2 * account::REASON_SLOTS + 1) * 8;
    account::Residuals, RESIDUALS;
    account::BooksTotal, 2 * RESIDUALS + 8;
    account::Deviation, 2 * SUM + 4 * 8;
}

/// The bytes of a structure.
pub fn bytes<T: Plain>(value: &T) -> &[u8] {
    // SAFETY: the structure has no padding, so that all its bytes are initialized; the slice lives no longer than it.
    unsafe { core::slice::from_raw_parts(core::ptr::from_ref(value).cast(), size_of::<T>()) }
}

/// The structure of these bytes; `None` when there are not as many as it needs.
pub fn from_bytes<T: Plain>(bytes: &[u8]) -> Option<T> {
    let mut value = MaybeUninit::<T>::uninit();
    if bytes.len() != size_of::<T>() {
        return None;
    }
    // SAFETY: as many bytes as the structure has are copied to it, from memory that cannot overlap it; any bits are valid.
    unsafe {
        core::ptr::copy_nonoverlapping(bytes.as_ptr(), value.as_mut_ptr().cast(), bytes.len());
        Some(value.assume_init())
    }
}
