//! Status codes and the detail of an error.

use core::ffi::{CStr, c_char};

use moistair_core::columns::{ColumnMismatch, NAN};
use moistair_core::{Error, NoValue};

/// Success.
pub const MOISTAIR_OK: i32 = 0;
/// A pointer is null that may not be.
pub const MOISTAIR_NULL_POINTER: i32 = 101;
/// A selector that names nothing, or nothing that fits here.
pub const MOISTAIR_UNKNOWN_SELECTOR: i32 = 102;
/// A pointer is not aligned for its type.
pub const MOISTAIR_MISALIGNED: i32 = 103;
/// Memory to be written overlaps other memory of the call.
pub const MOISTAIR_OVERLAPPING: i32 = 104;
/// A count or a stride reaches beyond the address space.
pub const MOISTAIR_TOO_LONG: i32 = 105;
/// A structure holds what the library cannot have written.
pub const MOISTAIR_DAMAGED: i32 = 106;
/// There are not as many columns as the process takes or gives.
pub const MOISTAIR_WRONG_COUNT: i32 = 107;
/// A value is NaN or infinite.
pub const MOISTAIR_NOT_FINITE: i32 = 201;
/// A value lies outside the declared range of its quantity.
pub const MOISTAIR_OUT_OF_RANGE: i32 = 202;
/// No state has this value at this dry bulb and pressure.
pub const MOISTAIR_UNATTAINABLE: i32 = 203;
/// States of different formulations in one process.
pub const MOISTAIR_MIXED_FORMULATIONS: i32 = 205;
/// Streams at different pressures where one pressure is needed.
pub const MOISTAIR_MIXED_PRESSURES: i32 = 206;
/// A process on no air at all.
pub const MOISTAIR_NO_FLOW: i32 = 207;
/// A channel makes no sense: limits that are not in order, or a unit of another kind.
pub const MOISTAIR_INVALID_CHANNEL: i32 = 208;
/// Two properties that fix no state together, only badly, or whose pair is not offered.
pub const MOISTAIR_UNDETERMINED: i32 = 209;
/// No state at this pressure has both properties.
pub const MOISTAIR_UNATTAINABLE_TOGETHER: i32 = 210;
/// Air with droplets or ice where a process knows dry gas only.
pub const MOISTAIR_CARRIES_CONDENSATE: i32 = 211;
/// The process cannot reach what was asked.
pub const MOISTAIR_INFEASIBLE: i32 = 301;
/// A sum would not be finite. Nothing was added.
pub const MOISTAIR_OVERFLOW: i32 = 302;
/// No value: there is no water vapor.
pub const MOISTAIR_NO_VALUE_DRY_AIR: i32 = 310;
/// No value: the saturation pressure exceeds the total pressure.
pub const MOISTAIR_NO_VALUE_ABOVE_BOILING: i32 = 311;
/// No value: it would lie below the range of saturation over this surface.
pub const MOISTAIR_NO_VALUE_BELOW_SURFACE_RANGE: i32 = 312;
/// No value: it would lie above the range of saturation over this surface.
pub const MOISTAIR_NO_VALUE_ABOVE_SURFACE_RANGE: i32 = 313;
/// Of a derivative: a slope has no bound where the vapor vanishes.
pub const MOISTAIR_NO_VALUE_UNBOUNDED_SLOPE: i32 = 314;
/// A fault of the library: a result was not a finite number. Nothing was written.
pub const MOISTAIR_INTERNAL: i32 = 901;

/// The detail of an error. Written whenever a place for it is given; after a success code is 0 and quantity is -1.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_error {
    /// The offending value in the unit of its quantity; NaN where there is none. For a selector of something else than a quantity
    /// (MOISTAIR_UNKNOWN_SELECTOR) the selector given; for MOISTAIR_WRONG_COUNT the count given.
    pub value: f64,
    /// The least value allowed; NaN where there is none.
    pub min: f64,
    /// The greatest value allowed; NaN where there is none.
    pub max: f64,
    /// The status that the function returns.
    pub code: i32,
    /// The selector of the quantity at fault, also one that is not known or does not fit; -1 where there is none.
    pub quantity: i32,
}

impl moistair_error {
    pub(crate) const NONE: Self = Self { value: NAN, min: NAN, max: NAN, code: MOISTAIR_OK, quantity: -1 };
}

/// Why a call fails.
#[derive(Clone, Copy, Debug)]
pub(crate) enum Failure {
    NullPointer,
    Misaligned,
    Overlapping,
    TooLong,
    /// The selector of a quantity.
    UnknownQuantity(i32),
    /// A selector of anything else.
    UnknownSelector(i32),
    Damaged,
    /// How many columns there are, and the fewest and the most that there may be.
    WrongCount {
        given: usize,
        fewest: usize,
        most: usize,
    },
    NotFinite,
    InvalidChannel,
    Overflow,
    Internal,
    Core(Error),
}

impl From<Error> for Failure {
    fn from(error: Error) -> Self {
        Self::Core(error)
    }
}

impl From<ColumnMismatch> for Failure {
    fn from(mismatch: ColumnMismatch) -> Self {
        match mismatch {
            ColumnMismatch::UnknownSelector { code } => Self::UnknownQuantity(code),
            _ => Self::TooLong,
        }
    }
}

impl From<Failure> for moistair_error {
    fn from(failure: Failure) -> Self {
        let plain = |code| Self { code, ..Self::NONE };
        match failure {
            Failure::NullPointer => plain(MOISTAIR_NULL_POINTER),
            Failure::Misaligned => plain(MOISTAIR_MISALIGNED),
            Failure::Overlapping => plain(MOISTAIR_OVERLAPPING),
            Failure::TooLong => plain(MOISTAIR_TOO_LONG),
            Failure::Damaged => plain(MOISTAIR_DAMAGED),
            Failure::WrongCount { given, fewest, most } => {
                Self { value: given as f64, min: fewest as f64, max: most as f64, ..plain(MOISTAIR_WRONG_COUNT) }
            }
            Failure::NotFinite => plain(MOISTAIR_NOT_FINITE),
            Failure::InvalidChannel => plain(MOISTAIR_INVALID_CHANNEL),
            Failure::Overflow => plain(MOISTAIR_OVERFLOW),
            Failure::Internal => plain(MOISTAIR_INTERNAL),
            Failure::UnknownSelector(selector) => {
                Self { value: f64::from(selector), ..plain(MOISTAIR_UNKNOWN_SELECTOR) }
            }
            Failure::UnknownQuantity(quantity) | Failure::Core(Error::UnknownSelector { code: quantity }) => {
                Self { quantity, ..plain(MOISTAIR_UNKNOWN_SELECTOR) }
            }
            Failure::Core(error) => {
                let (value, min, max) = error.value_and_limits().unwrap_or((NAN, NAN, NAN));
                // Every NaN that leaves the library is the same one.
                let [value, min, max] = [value, min, max].map(|number| if number.is_nan() { NAN } else { number });
                let quantity = error.quantity().map_or(-1, |quantity| quantity.code());
                Self { value, min, max, code: error.code(), quantity }
            }
        }
    }
}

/// A status in words: English, lower case, static. Unknown codes read "unknown status".
#[unsafe(no_mangle)]
pub extern "C" fn moistair_status_text(code: i32) -> *const c_char {
    text(code).unwrap_or(c"unknown status").as_ptr()
}

/// The text of a status, if there is such a status.
#[must_use]
pub fn text(code: i32) -> Option<&'static CStr> {
    Some(match code {
        MOISTAIR_OK => c"success",
        MOISTAIR_NULL_POINTER => c"a pointer is null",
        MOISTAIR_UNKNOWN_SELECTOR => c"a selector does not name what is needed here",
        MOISTAIR_MISALIGNED => c"a pointer is not aligned for its type",
        MOISTAIR_OVERLAPPING => c"memory to be written overlaps other memory of the call",
        MOISTAIR_TOO_LONG => c"a count or a stride reaches beyond the address space",
        MOISTAIR_DAMAGED => c"a structure holds what the library cannot have written",
        MOISTAIR_WRONG_COUNT => c"there are not as many columns as the process takes or gives",
        MOISTAIR_NOT_FINITE => c"a value is not a finite number",
        MOISTAIR_OUT_OF_RANGE => c"a value is outside the range of its quantity",
        MOISTAIR_UNATTAINABLE => c"no state has this value at this dry bulb and pressure",
        MOISTAIR_MIXED_FORMULATIONS => c"states of different formulations cannot be combined",
        MOISTAIR_MIXED_PRESSURES => c"states at different pressures need the pressure of the outlet",
        MOISTAIR_NO_FLOW => c"the dry-air mass flow is zero",
        MOISTAIR_INVALID_CHANNEL => c"the limits of a channel are not in order, or its unit is of another kind",
        MOISTAIR_UNDETERMINED => c"the two properties fix no state together, only badly, or their pair is not offered",
        MOISTAIR_UNATTAINABLE_TOGETHER => c"no state at this pressure has both properties",
        MOISTAIR_CARRIES_CONDENSATE => c"the air carries droplets or ice, which this process does not describe",
        MOISTAIR_OVERFLOW => c"a sum would not be finite",
        MOISTAIR_INFEASIBLE => c"the process cannot reach what was asked",
        MOISTAIR_NO_VALUE_DRY_AIR => c"no value: there is no water vapor",
        MOISTAIR_NO_VALUE_ABOVE_BOILING => c"no value: the saturation pressure exceeds the total pressure",
        MOISTAIR_NO_VALUE_BELOW_SURFACE_RANGE => c"no value: below the range of saturation over this surface",
        MOISTAIR_NO_VALUE_ABOVE_SURFACE_RANGE => c"no value: above the range of saturation over this surface",
        MOISTAIR_NO_VALUE_UNBOUNDED_SLOPE => c"no derivative: a slope has no bound where the vapor vanishes",
        MOISTAIR_INTERNAL => c"a result is not a finite number: a fault of the library",
        _ => return None,
    })
}

/// A code here is the code of the core: the constants above are written out for the header.
const _: () = {
    const fn no_value(reason: NoValue) -> i32 {
        Error::NoValue { quantity: moistair_core::Quantity::DewPoint, reason }.code()
    }
    assert!(Error::UnknownSelector { code: 0 }.code() == MOISTAIR_UNKNOWN_SELECTOR);
    assert!(Error::NotFinite { quantity: moistair_core::Quantity::DewPoint }.code() == MOISTAIR_NOT_FINITE);
    assert!(Error::MixedFormulations.code() == MOISTAIR_MIXED_FORMULATIONS);
    assert!(Error::MixedPressures.code() == MOISTAIR_MIXED_PRESSURES);
    assert!(Error::NoFlow.code() == MOISTAIR_NO_FLOW);
    assert!(Error::CarriesCondensate.code() == MOISTAIR_CARRIES_CONDENSATE);
    let (first, second) = (moistair_core::Quantity::DewPoint, moistair_core::Quantity::DewPoint);
    let undetermined = Error::Undetermined { first, second, reason: moistair_core::Undetermined::Twice };
    assert!(undetermined.code() == MOISTAIR_UNDETERMINED);
    let together = Error::UnattainableTogether { quantity: first, value: 0.0, with: first, min: 0.0, max: 0.0 };
    assert!(together.code() == MOISTAIR_UNATTAINABLE_TOGETHER);
    assert!(no_value(NoValue::DryAir) == MOISTAIR_NO_VALUE_DRY_AIR);
    assert!(no_value(NoValue::AboveBoiling) == MOISTAIR_NO_VALUE_ABOVE_BOILING);
    assert!(no_value(NoValue::BelowSurfaceRange) == MOISTAIR_NO_VALUE_BELOW_SURFACE_RANGE);
    assert!(no_value(NoValue::AboveSurfaceRange) == MOISTAIR_NO_VALUE_ABOVE_SURFACE_RANGE);
    assert!(no_value(NoValue::UnboundedSlope) == MOISTAIR_NO_VALUE_UNBOUNDED_SLOPE);
};
