//! The formulations of a build: the feature `helmholtz` may leave one out.
#![allow(clippy::unwrap_used, reason = "a test")]

use moistair_core::{Basis, Formulation, MoistAir, Pressure, Quantity, RelativeHumidity, Temperature};

/// `cargo test -p moistair-core --no-default-features --features std --test formulations` sees it left out.
#[test]
fn code_two_is_known_where_it_is_built_in() {
    let built_in = cfg!(feature = "helmholtz");
    assert_eq!(Formulation::from_code(2).is_some(), built_in);
    assert_eq!(Formulation::ALL.len(), if built_in { 3 } else { 2 });
    for &formulation in Formulation::ALL {
        assert_eq!(Formulation::from_code(formulation.code()), Some(formulation));
    }
    assert!(Formulation::from_code(3).is_none() && Formulation::from_code(-1).is_none());
}

/// Only what 200 °C and 5 MPa ask for is wider, and no range is narrower.
#[test]
fn limits_contain_those_of_the_table() {
    for &formulation in Formulation::ALL {
        for quantity in Quantity::ALL {
            let ((low, high), (min, max)) = (formulation.limits(*quantity), quantity.limits());
            assert!(low <= min && max <= high, "{formulation:?} {quantity:?}");
            assert!(formulation.code() == 2 || (low, high) == (min, max));
        }
    }
}

/// At both ends of the range of each formulation there is a state, and what it reads lies within what it takes.
#[test]
fn states_at_the_ends() {
    let mut made = 0;
    for &formulation in Formulation::ALL {
        let (coldest, warmest) = formulation.limits(Quantity::DryBulb);
        let (low, high) = formulation.limits(Quantity::Pressure);
        for celsius in [coldest, warmest] {
            for pascals in [low, high] {
                let basis = Basis::new(Pressure::from_pascals(pascals), formulation);
                let by = |celsius| {
                    let humidity = RelativeHumidity::from_fraction(0.5);
                    let dry_bulb = Temperature::from_celsius(celsius);
                    MoistAir::from_dry_bulb(dry_bulb, humidity, basis)
                        .or_else(|_| MoistAir::from_dry_bulb_and(dry_bulb, Quantity::WaterMoleFraction, 0.5, basis))
                };
                let air = by(celsius).unwrap();
                // Every property is a number or has no value there.
                for quantity in Quantity::ALL.iter().filter(|quantity| quantity.is_property()) {
                    assert!(air.value(*quantity).map_or(true, f64::is_finite), "{quantity:?} {air:?}");
                }
                for fixing in Quantity::ALL.iter().filter(|quantity| quantity.fixes_state()) {
                    let (min, max) = formulation.limits(*fixing);
                    let Ok(value) = air.value(*fixing) else { continue };
                    assert!(min <= value && value <= max, "{formulation:?} {fixing:?} {value}: {min} to {max}");
                }
                made += 1;
            }
        }
        let beyond = Basis::new(Pressure::from_pascals(high * 1.001), formulation);
        let humidity = RelativeHumidity::from_fraction(0.5);
        assert!(MoistAir::from_dry_bulb(Temperature::from_celsius(20.0), humidity, beyond).is_err());
    }
    assert_eq!(made, 4 * Formulation::ALL.len());
}
