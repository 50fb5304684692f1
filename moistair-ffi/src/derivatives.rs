//! Partial derivatives of the properties of a state.

use moistair_core::PropertyDerivatives;
use moistair_core::columns::NAN;

use crate::memory::{check, check_optional, read, report, write};
use crate::quantity::quantity;
use crate::state::{check_mask, moistair_state, properties};
use crate::status::moistair_error;

/// A property and its partial derivatives, each while the other two inputs stay.
#[repr(C)]
#[derive(Clone, Copy, Debug)]
pub struct moistair_property_derivatives {
    /// The property, with the bits of moistair_properties.
    pub value: f64,
    /// Per kelvin of dry bulb.
    pub by_dry_bulb: f64,
    /// Per unit of the second property.
    pub by_second: f64,
    /// Per pascal.
    pub by_pressure: f64,
}

impl moistair_property_derivatives {
    const NONE: Self = Self { value: NAN, by_dry_bulb: NAN, by_second: NAN, by_pressure: NAN };
}

impl From<PropertyDerivatives> for moistair_property_derivatives {
    fn from(of: PropertyDerivatives) -> Self {
        Self { value: of.value, by_dry_bulb: of.by_dry_bulb, by_second: of.by_second, by_pressure: of.by_pressure }
    }
}

/// Exact partial derivatives of properties with respect to dry bulb, a second property and pressure: those of moistair_from_dry_bulb with
/// that second property. Where a property has a kink, those of one side: at the melting temperature and above over liquid, below over
/// ice; at saturation towards less vapor; in dry air towards more.
///
/// state: a state; second: selector of the second property, one that fixes a state; mask: which properties, the bit 1 << selector for each;
/// values: output, each property at the place of its selector, NaN where it has no value or (entropy of dry air) no slope; places not
/// asked for are left alone; have: output, the bits of mask that have derivatives, may be null; error: may be null.
/// Returns 0 (also when a property has no value), 101, 102 (a bit that is no property, a second property that fixes no state), 103, 31x
/// (the second property has no value at this state), 201, 202, 203 (the state is none).
#[unsafe(no_mangle)]
pub unsafe extern "C" fn moistair_derivatives(
    state: *const moistair_state,
    second: i32,
    mask: u64,
    values: *mut moistair_property_derivatives,
    have: *mut u64,
    error: *mut moistair_error,
) -> i32 {
    let call = || {
        check(values)?;
        check_optional(have)?;
        check_mask(mask)?;
        // SAFETY: the caller's pointer.
        let air = unsafe { read(state) }?.to_core()?;
        let mut found = 0;
        air.derivatives_of(properties(mask), quantity(second)?, |property, derivatives| {
            found |= if derivatives.is_ok() { 1_u64 << property.code() } else { 0 };
            let derivatives = derivatives.map_or(moistair_property_derivatives::NONE, Into::into);
            // SAFETY: the caller has room for every property of the mask.
            unsafe { write(values.add(property.code() as usize), derivatives) };
        })?;
        // SAFETY: the caller's pointer.
        unsafe { write(have, found) };
        Ok(())
    };
    // SAFETY: the caller's pointer.
    unsafe { report(error, call) }
}

const _: () = assert!(size_of::<moistair_property_derivatives>() == 32);
