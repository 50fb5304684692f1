//! The one place where pointers of the caller are checked and followed.

use crate::status::{Failure, MOISTAIR_INTERNAL, MOISTAIR_OK, moistair_error};

/// A value that a function answers with.
pub(crate) trait Answer: Copy {
    /// Whether every number in it that must have a value is finite.
    fn is_finite(&self) -> bool;
}

impl Answer for f64 {
    fn is_finite(&self) -> bool {
        f64::is_finite(*self)
    }
}

/// Null and alignment.
pub(crate) fn check<T>(pointer: *const T) -> Result<(), Failure> {
    match (pointer.is_null(), pointer.is_aligned()) {
        (true, _) => Err(Failure::NullPointer),
        (_, false) => Err(Failure::Misaligned),
        _ => Ok(()),
    }
}

/// Null and alignment of a place that may be null.
pub(crate) fn check_optional<T>(pointer: *const T) -> Result<(), Failure> {
    if pointer.is_null() { Ok(()) } else { check(pointer) }
}

/// The value at a pointer.
pub(crate) unsafe fn read<T: Copy>(pointer: *const T) -> Result<T, Failure> {
    check(pointer)?;
    // SAFETY: not null, aligned, and the caller's to read.
    Ok(unsafe { pointer.read() })
}

/// Writes an output that has been checked, unless it is null.
pub(crate) unsafe fn write<T>(pointer: *mut T, value: T) {
    if !pointer.is_null() && pointer.is_aligned() {
        // SAFETY: not null, aligned, and the caller's to write.
        unsafe { pointer.write(value) }
    }
}

/// Runs a call: the status, and its detail if the caller has a place for it.
pub(crate) unsafe fn report(error: *mut moistair_error, call: impl FnOnce() -> Result<(), Failure>) -> i32 {
    let result = check_optional(error).and_then(|()| call());
    let detail = result.map_or_else(moistair_error::from, |()| moistair_error::NONE);
    // SAFETY: the caller's.
    unsafe { write(error, detail) };
    detail.code
}

/// Runs a call with one output, which is written only on success.
pub(crate) unsafe fn answer<T: Answer>(
    output: *mut T,
    error: *mut moistair_error,
    call: impl FnOnce() -> Result<T, Failure>,
) -> i32 {
    let call = || {
        check(output)?;
        let value = call()?;
        if !value.is_finite() {
            return Err(Failure::Internal);
        }
        // SAFETY: the caller's.
        unsafe { write(output, value) };
        Ok(())
    };
    // SAFETY: the caller's.
    unsafe { report(error, call) }
}

const _: () = assert!(MOISTAIR_OK == 0 && MOISTAIR_INTERNAL == 901);
