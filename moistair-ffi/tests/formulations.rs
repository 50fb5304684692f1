//! The formulations through C: their limits, what the Helmholtz formulation reaches, and what no build knows.

#![allow(clippy::unwrap_used, clippy::float_cmp, reason = "a test")]

use core::ptr::null_mut;

use moistair::*;
use moistair_core::{Formulation, Quantity};

fn limits(formulation: i32, quantity: i32) -> (i32, f64, f64, moistair_error) {
    let mut limits = moistair_limits { min: -1.0, max: -1.0 };
    let mut error = moistair_error { value: 0.0, min: 0.0, max: 0.0, code: 0, quantity: 0 };
    // SAFETY: valid places.
    let status = unsafe { moistair_formulation_limits(formulation, quantity, &mut limits, &mut error) };
    (status, limits.min, limits.max, error)
}

#[test]
fn limits_are_those_of_the_core() {
    for formulation in Formulation::ALL {
        for quantity in Quantity::ALL {
            let (status, min, max, _) = limits(formulation.code(), quantity.code());
            assert_eq!(
                (status, (min, max)),
                (MOISTAIR_OK, formulation.limits(*quantity)),
                "{formulation:?} {quantity:?}"
            );
        }
    }
    let (status, min, _, error) = limits(7, MOISTAIR_PRESSURE);
    assert_eq!((status, min, error.quantity), (MOISTAIR_UNKNOWN_SELECTOR, -1.0, -1));
    let (status, _, _, error) = limits(MOISTAIR_HELMHOLTZ, 999);
    assert_eq!((status, error.quantity), (MOISTAIR_UNKNOWN_SELECTOR, 999));
}

#[test]
fn compressed_hot_air() {
    let make = |formulation| {
        let basis = moistair_basis { pressure: 4e6, formulation, reserved: 0 };
        let mut state = core::mem::MaybeUninit::<moistair_state>::zeroed();
        // SAFETY: a valid place; all bits zero are a state's numbers.
        unsafe {
            let status =
                moistair_from_dry_bulb(180.0, MOISTAIR_RELATIVE_HUMIDITY, 0.5, basis, state.as_mut_ptr(), null_mut());
            (status, state.assume_init())
        }
    };
    let (status, state) = make(MOISTAIR_HELMHOLTZ);
    assert_eq!((status, state.formulation), (MOISTAIR_OK, MOISTAIR_HELMHOLTZ));
    let mut fugacity = 0.0;
    // SAFETY: valid places.
    let status = unsafe { moistair_property(&state, MOISTAIR_FUGACITY_OF_WATER, &mut fugacity, null_mut()) };
    assert_eq!(status, MOISTAIR_OK);
    assert!((0.85..1.0).contains(&(fugacity / state.vapor_pressure)), "{fugacity} {}", state.vapor_pressure);
    assert_eq!(make(MOISTAIR_REAL_GAS).0, MOISTAIR_OUT_OF_RANGE);
    assert_eq!(make(3).0, MOISTAIR_UNKNOWN_SELECTOR);
}
