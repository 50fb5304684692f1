//! States from two properties of which neither is the dry bulb.

use moistair_core::*;
use moistair_tests::pairs::{condition, is_refused, offered, round_trip, sensitivity, table};
use proptest::prelude::*;

use crate::hostile::{any_number, inspect};
use crate::round_trip::uncertainty;
use crate::support::{cases, state};

/// The table of accuracy. A round trip is within 1e-8 K and 1e-9 of the humidity ratio (the worst seen: 2e-9 K, 1e-10); in a room no pair
/// that is offered multiplies an error by more than 15, and the wet bulb with the enthalpy, refused, does by more than 50.
#[test]
fn table_of_pairs() {
    for formulation in [Formulation::RealGas, Formulation::IdealGas] {
        println!("{formulation:?}\n{}", table(formulation, 2_000));
        for pair in moistair_tests::pairs::measure(formulation, 500) {
            assert!(pair.kelvins < 1e-8 && pair.vapor < 1e-9 && pair.condition_indoors < 15.0, "{pair:?}");
        }
    }
    assert_eq!(offered().len(), 54);
    let site = Pressure::from_kilopascals(101.325);
    let least = (5..=40)
        .flat_map(|t| [0.2, 0.5, 0.9].map(|humidity| (f64::from(t), RelativeHumidity::from_fraction(humidity))))
        .map(|(t, humidity)| MoistAir::from_dry_bulb(Temperature::from_celsius(t), humidity, site).unwrap())
        .filter_map(|air| condition(&air, Quantity::WetBulbOverLiquid, Quantity::SpecificEnthalpy).ok())
        .fold(f64::INFINITY, f64::min);
    println!("wet bulb and specific enthalpy: at least {least:.0}");
    assert!(least > 50.0);
}

proptest! {
    #![proptest_config(cases(3_000))]

    /// Every pair of a state's properties makes it again. Tolerance: what of both values rounding and their solves may have changed, by
    /// the exact derivatives; and 2e-9 K for the pair's own solve.
    #[test]
    fn every_pair(air in state()) {
        for (first, second) in offered() {
            let Some(errors) = round_trip(&air, first, second) else { continue };
            let [kelvins, _] = errors.map_err(|error| TestCaseError::fail(format!("{first} and {second}: {error}")))?;
            let Ok(slopes) = sensitivity(&air, first, second) else { continue };
            let off = |quantity, slope: f64| slope.abs() * uncertainty(quantity, air.value(quantity).unwrap(), &air);
            let tolerance = 2e-9 + 4.0 * (off(first, slopes[0]) + off(second, slopes[1]));
            prop_assert!(kelvins <= tolerance, "{first} and {second}: {kelvins:e} K, {tolerance:e} allowed");
        }
    }
}

fn any_pair() -> impl Strategy<Value = (Quantity, f64, Quantity, f64)> {
    let one = || {
        prop::sample::select(Quantity::ALL).prop_flat_map(|quantity| {
            let (low, high) = quantity.limits();
            (Just(quantity), any_number(low.max(-1e9), high.min(1e9)))
        })
    };
    (one(), one()).prop_map(|((first, a), (second, b))| (first, a, second, b))
}

proptest! {
    #![proptest_config(cases(40_000))]

    /// Any bits in any argument: a state that reads well, or an error with a true reason.
    #[test]
    fn any_bits((first, a, second, b) in any_pair(), pascals in any_number(20e3, 1.1e6), ideal in any::<bool>()) {
        let formulation = if ideal { Formulation::IdealGas } else { Formulation::RealGas };
        let basis = Basis::new(Pressure::from_pascals(pascals), formulation);
        match MoistAir::from_two_properties_and(first, a, second, b, basis) {
            Ok(air) => {
                prop_assert!(!is_refused(first, second));
                inspect(&air)?;
            }
            Err(error) => {
                prop_assert!(error.code() > 100 && !error.to_string().contains("NaN"), "{error}");
                prop_assert!(!matches!(error, Error::Unattainable { .. }), "{error}");
                if let Error::UnattainableTogether { quantity, value, with, min, max } = error {
                    let given = if quantity == first { a } else { b };
                    prop_assert!([(first, second), (second, first)].contains(&(quantity, with)));
                    prop_assert!(min.is_finite() && max.is_finite() && value.to_bits() == given.to_bits(), "{error}");
                }
            }
        }
        let single = Basis::new(Pressure::from_pascals(pascals as f32), formulation);
        if let Ok(air) = MoistAir::<f32>::from_two_properties_and(first, a as f32, second, b as f32, single) {
            prop_assert!(Quantity::ALL.iter().all(|quantity| air.value(*quantity).map_or(true, f32::is_finite)), "{air:?}");
        }
    }
}

/// Texts name what was asked for and why there is none.
#[test]
fn texts() {
    let basis: Basis = Basis::real_gas(Pressure::from_kilopascals(101.325));
    let refused =
        |first, a, second, b| MoistAir::from_two_properties_and(first, a, second, b, basis).unwrap_err().to_string();
    assert_eq!(
        refused(Quantity::DewPoint, 10.0, Quantity::HumidityRatio, 0.008),
        "dew point and humidity ratio make no state: both say how much vapor there is, which air of any \
         temperature may hold"
    );
    let text = refused(Quantity::DewPoint, 20.0, Quantity::WetBulb, 10.0);
    assert!(
        text.starts_with(
            "wet bulb 10 °C has no state together with this dew point: at this pressure it lies between 19.99"
        ),
        "{text}"
    );
    let text = refused(Quantity::RelativeHumidity, 0.5, Quantity::SpecificEnthalpy, -89_000.0);
    assert!(text.starts_with("specific enthalpy -89000 J/kg has no state"), "{text}");
}
