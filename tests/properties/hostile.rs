//! Any bits in any argument: a state or an error, never a panic, never a NaN in a state.

use moistair_core::*;
use proptest::prelude::*;

use crate::support::cases;

/// Any bits, and numbers near the domain.
pub fn any_number(low: f64, high: f64) -> impl Strategy<Value = f64> {
    prop_oneof![
        2 => any::<u64>().prop_map(f64::from_bits),
        2 => prop_oneof![
            Just(f64::NAN), Just(f64::INFINITY), Just(f64::NEG_INFINITY), Just(0.0), Just(-0.0), Just(f64::MIN_POSITIVE), Just(5e-324),
            Just(-5e-324), Just(f64::MAX), Just(f64::MIN), Just(1.0), Just(low), Just(high),
        ],
        1 => prop_oneof![Just(low), Just(high)].prop_flat_map(|end| (-2_i64..=2).prop_map(move |ulps| {
            f64::from_bits((end.to_bits() as i64).wrapping_add(ulps) as u64)
        })),
        5 => low..=high,
    ]
}

fn any_argument() -> impl Strategy<Value = (f64, f64, Quantity, f64, Formulation)> {
    let quantity = prop::sample::select(Quantity::ALL);
    (quantity, prop::sample::select(Formulation::ALL)).prop_flat_map(|(quantity, formulation)| {
        let near = |quantity| {
            let (low, high) = formulation.limits(quantity);
            any_number(low.max(-1e9), high.min(1e9))
        };
        (near(Quantity::DryBulb), near(Quantity::Pressure), Just(quantity), near(quantity), Just(formulation))
    })
}

/// Everything that can be read from a state is a number or a reason, and stands in a sane relation to the rest.
pub fn inspect(air: &MoistAir) -> Result<(), TestCaseError> {
    let (celsius, w) = (air.dry_bulb().celsius(), air.humidity_ratio().kilograms_per_kilogram());
    let (coldest, warmest) = air.formulation().limits(Quantity::DryBulb);
    prop_assert!((coldest..=warmest).contains(&celsius) && (0.0..=10.0).contains(&w), "{air:?}");
    for &quantity in Quantity::ALL {
        match air.value(quantity) {
            Ok(value) => prop_assert!(value.is_finite() && quantity.is_property(), "{quantity:?} {value} {air:?}"),
            Err(Error::NoValue { quantity: named, .. }) => prop_assert!(named == quantity && quantity.is_property()),
            Err(Error::UnknownSelector { code }) => prop_assert!(code == quantity.code() && !quantity.is_property()),
            Err(other) => prop_assert!(false, "{quantity:?} {other:?}"),
        }
    }
    let positive = [
        air.specific_volume().cubic_meters_per_kilogram(),
        air.specific_heat().joules_per_kilogram_kelvin(),
        air.density().kilograms_per_cubic_meter(),
        air.compressibility_factor(),
    ];
    prop_assert!(positive.iter().all(|value| *value > 0.0 && value.is_finite()), "{air:?}");
    Ok(())
}

/// Every derivative is a number, or there is a reason why there is none.
fn slopes(air: &MoistAir, second: Quantity) -> Result<(), TestCaseError> {
    let mut all = Vec::new();
    let result = air.derivatives_of(Quantity::ALL.iter().copied(), second, |property, of| all.push((property, of)));
    if result.is_err() {
        // A state that was made by a property may have no value of it: dry air made by a wet bulb over ice above the melting temperature.
        prop_assert!(all.is_empty() && air.value(second).is_err(), "{second:?} {air:?}");
    }
    for (property, of) in all {
        match of {
            Ok(of) => {
                let numbers = [of.value, of.by_dry_bulb, of.by_second, of.by_pressure];
                prop_assert!(numbers.iter().all(|number| number.is_finite()), "{property:?} {of:?} {air:?}");
            }
            Err(Error::UnknownSelector { code }) => prop_assert!(code == property.code() && !property.is_property()),
            Err(Error::NoValue { quantity, .. }) => prop_assert!(quantity == property),
            Err(other) => prop_assert!(false, "{property:?} {other:?}"),
        }
    }
    Ok(())
}

proptest! {
    #![proptest_config(cases(20_000))]

    #[test]
    fn any_bits((celsius, pascals, quantity, value, formulation) in any_argument()) {
        let basis = Basis::new(Pressure::from_pascals(pascals), formulation);
        match MoistAir::from_dry_bulb_and(Temperature::from_celsius(celsius), quantity, value, basis) {
            Ok(air) => {
                prop_assert_eq!(air.dry_bulb().celsius().to_bits(), celsius.to_bits());
                prop_assert_eq!(air.pressure().pascals().to_bits(), pascals.to_bits());
                inspect(&air)?;
                slopes(&air, quantity)?;
            }
            Err(error) => {
                // Every refusal has a code and a text; one with limits has a true reason.
                prop_assert!(error.code() > 100 && !error.to_string().contains("NaN"), "{error}");
                if let Error::Unattainable { value, min, max, .. } = error {
                    prop_assert!(min.is_finite() && max.is_finite() && !(min < value && value < max), "{error}");
                }
                if let Error::OutOfRange { value, min, max, .. } = error {
                    prop_assert!(!(min <= value && value <= max), "{error}");
                }
            }
        }
    }

    /// The same in single precision.
    #[test]
    fn any_bits_in_single_precision((celsius, pascals, quantity, value, formulation) in any_argument()) {
        let (celsius, value) = (celsius as f32, value as f32);
        let basis = Basis::new(Pressure::from_pascals(pascals as f32), formulation);
        if let Ok(air) = MoistAir::from_dry_bulb_and(Temperature::from_celsius(celsius), quantity, value, basis) {
            prop_assert_eq!(air.dry_bulb().celsius().to_bits(), celsius.to_bits());
            for &quantity in Quantity::ALL {
                prop_assert!(air.value(quantity).map_or(true, f32::is_finite), "{quantity:?} {air:?}");
            }
        }
    }

    /// Standard atmosphere: a pressure or an error.
    #[test]
    fn any_elevation(meters in any_number(-5_000.0, 11_000.0)) {
        for pressure in [Pressure::at_elevation(Length::from_meters(meters)), Pressure::at_geometric_elevation(Length::from_meters(meters))] {
            match pressure {
                Ok(pressure) => prop_assert!((20e3..200e3).contains(&pressure.pascals())),
                Err(error) => prop_assert!(error.quantity() == Some(Quantity::Elevation)),
            }
        }
    }

    /// The other way, and its temperature: an elevation of the layer, or an error that names the pressure.
    #[test]
    fn any_barometer(pascals in any_number(22_000.0, 180_000.0), meters in any_number(-5_000.0, 11_000.0)) {
        let pressure = Pressure::from_pascals(pascals);
        for elevation in [Length::elevation_at_pressure(pressure), Length::geometric_elevation_at_pressure(pressure)] {
            match elevation {
                Ok(elevation) => prop_assert!((-5e3..=11e3).contains(&elevation.meters())),
                Err(error) => prop_assert!(error.quantity() == Some(Quantity::Pressure)),
            }
        }
        let length = Length::from_meters(meters);
        for temperature in [Temperature::at_elevation(length), Temperature::at_geometric_elevation(length)] {
            match temperature {
                Ok(temperature) => prop_assert!((-57.0..=48.0).contains(&temperature.celsius())),
                Err(error) => prop_assert!(error.quantity() == Some(Quantity::Elevation)),
            }
        }
    }
}
