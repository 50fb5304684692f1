//! A property read from a state makes the state again.

use std::cell::RefCell;
use std::collections::BTreeMap;

use moistair_core::*;
use proptest::prelude::*;
use proptest::test_runner::TestRunner;

use crate::support::{cases, from_ratio, greatest_ratio, ratio, state};

/// What of a value rounding and its solve may have changed: of a wet bulb 5e-10 K, of a dew or frost point 5e-12 K (what
/// their steps leave, as the core's own tests measure); of other values four units in the last place of what they are computed from
/// (enthalpy: of T τΨ_τ, which is larger than it).
pub fn uncertainty(quantity: Quantity, value: f64, air: &MoistAir) -> f64 {
    let size = match quantity.unit() {
        "°C" if matches!(quantity, Quantity::DewPoint | Quantity::FrostPoint) => return 5e-12,
        "°C" => return 5e-10,
        "J/kg" => 4e5 + 3e6 * ratio(air),
        _ => value.abs(),
    };
    4.0 * f64::EPSILON * size
}

/// |∂value/∂W| by a difference: towards dry air, or away from it where there is next to no vapor.
fn slope(quantity: Quantity, air: &MoistAir) -> Option<f64> {
    let (w, celsius) = (ratio(air), air.dry_bulb().celsius());
    let limit = greatest_ratio(celsius, air.basis());
    let other = if w > 1e-3 * limit { 0.999 * w } else { w + 1e-5 * limit };
    let other = from_ratio(celsius, other, air.basis()).ok()?;
    let difference = other.value(quantity).ok()? - air.value(quantity).ok()?;
    Some((difference / (ratio(&other) - w)).abs())
}

/// W → property → W for every property that fixes a state. The tolerance is the uncertainty of the value over ∂value/∂W.
#[test]
fn every_second_property() {
    let worst = RefCell::new(BTreeMap::<&str, (usize, f64)>::new());
    let mut runner = TestRunner::new(cases(1_500));
    let law = |air: MoistAir| {
        let (w, celsius) = (ratio(&air), air.dry_bulb());
        for quantity in Quantity::ALL.iter().copied().filter(|quantity| quantity.fixes_state()) {
            let Ok(value) = air.value(quantity) else { continue };
            if quantity == Quantity::WetBulb && value.abs() < 0.1 && near_the_melting_temperature(&air, value) {
                continue; // over which surface, a rounding would decide
            }
            let back = MoistAir::from_dry_bulb_and(celsius, quantity, value, air.basis());
            let back = back.map_err(|error| TestCaseError::fail(format!("{quantity:?} {value:e}: {error}")))?;
            prop_assert_eq!(back.dry_bulb().celsius().to_bits(), celsius.celsius().to_bits());
            let error = (ratio(&back) - w).abs();
            let Some(slope) = slope(quantity, &air) else { continue };
            let tolerance = uncertainty(quantity, value, &air) / slope + 4.0 * f64::EPSILON * w;
            prop_assert!(
                error <= tolerance,
                "{quantity:?} {value:e}: W {w:e} came back {error:e} off, {tolerance:e} allowed"
            );
            let mut worst = worst.borrow_mut();
            let entry = worst.entry(quantity.name()).or_default();
            *entry = (entry.0 + 1, entry.1.max(error / tolerance));
        }
        Ok(())
    };
    runner.run(&state(), law).unwrap();
    for (name, (count, share)) in worst.borrow().iter() {
        println!("{name}: {count} round trips, at worst {share:.3} of the tolerance");
    }
    assert_eq!(worst.borrow().len(), 16);
}

fn near_the_melting_temperature(air: &MoistAir, wet_bulb: f64) -> bool {
    let over = |quantity| air.value(quantity).map_or(f64::INFINITY, |value| (value - wet_bulb).abs());
    over(Quantity::WetBulbOverLiquid) > 1e-9 && over(Quantity::WetBulbOverIce) > 1e-9
}

proptest! {
    /// The numbers that define a state restore it bit for bit.
    #[test]
    fn restored_bit_for_bit(air in state()) {
        let back = MoistAir::restore(air.dry_bulb(), air.humidity_ratio(), air.basis()).unwrap();
        prop_assert_eq!(back, air);
        prop_assert_eq!(ratio(&back).to_bits(), ratio(&air).to_bits());
        prop_assert_eq!(back.dry_bulb().celsius().to_bits(), air.dry_bulb().celsius().to_bits());
        prop_assert_eq!(back.pressure().pascals().to_bits(), air.pressure().pascals().to_bits());
    }
}
