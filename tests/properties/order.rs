//! Orderings and monotonicity.

use moistair_core::*;
use proptest::prelude::*;

use crate::support::{cases, from_ratio, greatest_ratio, place, ratio, state, warmest};

/// Two solved temperatures may each be 1e-9 K off.
const SOLVES: f64 = 2e-9;

proptest! {
    #![proptest_config(cases(2_000))]

    /// Over liquid: dew point ≤ wet bulb ≤ dry bulb. Over ice the same, for air not supersaturated over it; the other way round for
    /// air that is.
    #[test]
    fn dew_point_wet_bulb_dry_bulb(air in state()) {
        let t = air.dry_bulb().celsius();
        let dew = air.dew_point().map(|x| x.celsius());
        let wet = air.wet_bulb_over_liquid().map(|x| x.celsius());
        if let (Ok(dew), Ok(wet)) = (dew, wet) {
            prop_assert!(dew <= wet + SOLVES && wet <= t + SOLVES, "{dew} {wet} {t}");
        }
        let frost = air.frost_point().map(|x| x.celsius());
        let wet = air.wet_bulb_over_ice().map(|x| x.celsius());
        if let (Ok(frost), Ok(wet)) = (frost, wet) {
            let rising = frost <= wet + SOLVES && wet <= t + SOLVES;
            let falling = frost >= wet - SOLVES && wet >= t - SOLVES;
            prop_assert!(if frost <= t { rising } else { falling }, "{frost} {wet} {t}");
        }
        if let (Ok(dew), Ok(frost)) = (air.dew_point(), air.frost_point()) {
            // Ice saturates with less: its temperature is the higher one below the melting temperature.
            prop_assert!(dew.celsius() <= frost.celsius() + SOLVES, "{dew:?} {frost:?}");
        }
    }

    /// With more vapor at the same temperature and pressure: enthalpy, volume, vapor pressure, humidities and wet bulb rise,
    /// density falls (but in dense cold air, −70 °C at 5 MPa, which vapor draws together). (The stable wet bulb steps where its surface changes: per surface only.)
    #[test]
    fn with_more_vapor((celsius, basis, share) in place(), other in 0.0..1.0_f64) {
        let limit = greatest_ratio(celsius, basis);
        let (less, more) = (share.min(other), share.max(other));
        prop_assume!(more - less > 1e-6);
        let (dry, moist) = (from_ratio(celsius, less * limit, basis).unwrap(), from_ratio(celsius, more * limit, basis).unwrap());
        let rising = [
            Quantity::SpecificEnthalpy, Quantity::SpecificVolume, Quantity::VaporPressure, Quantity::WaterMoleFraction,
            Quantity::SpecificHumidity, Quantity::AbsoluteHumidity, Quantity::RelativeHumidity, Quantity::RelativeHumidityOverLiquid,
            Quantity::DegreeOfSaturation, Quantity::WetBulbOverLiquid, Quantity::WetBulbOverIce, Quantity::DewPoint, Quantity::FrostPoint,
        ];
        for quantity in rising {
            if let (Ok(a), Ok(b)) = (dry.value(quantity), moist.value(quantity)) {
                let rounding = if quantity.unit() == "°C" { SOLVES } else { 8.0 * f64::EPSILON * b.abs().max(if quantity == Quantity::SpecificEnthalpy { 4e5 } else { 0.0 }) };
                prop_assert!(a <= b + rounding, "{quantity:?} {a:e} {b:e}");
            }
        }
        let (a, b) = (dry.density().kilograms_per_cubic_meter(), moist.density().kilograms_per_cubic_meter());
        prop_assert!(a >= b * (1.0 - 8.0 * f64::EPSILON) || b > 85.0, "{a} {b}");
    }

    /// At the same relative humidity over liquid, warmer air holds more; at the same temperature and relative humidity, air at higher
    /// pressure holds less.
    #[test]
    fn capacity_of_air((celsius, basis, share) in place(), kelvins in 0.01..20.0_f64, factor in 1.01..3.0_f64) {
        let celsius = celsius.max(-40.0);
        let warmer = (celsius + kelvins).min(warmest(basis));
        let pascals = basis.pressure().pascals();
        let at = |celsius: f64, pascals: f64| {
            let humidity = RelativeHumidityOverLiquid::from_fraction(share);
            let basis = basis.at_pressure(Pressure::from_pascals(pascals));
            MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), humidity, basis).map(|air| ratio(&air))
        };
        if let (Ok(cool), Ok(warm)) = (at(celsius, pascals), at(warmer, pascals)) {
            prop_assert!(cool <= warm, "{cool:e} {warm:e}");
        }
        let denser = (pascals * factor).min(basis.formulation().limits(Quantity::Pressure).1);
        if let (Ok(thin), Ok(dense)) = (at(celsius, pascals), at(celsius, denser)) {
            prop_assert!(thin >= dense, "{thin:e} {dense:e}");
        }
    }

    /// Enthalpy and volume rise with temperature at constant vapor.
    #[test]
    fn with_temperature(air in state(), kelvins in 1e-3..20.0_f64) {
        let celsius = air.dry_bulb().celsius();
        let warmer = (celsius + kelvins).min(warmest(air.basis()));
        prop_assume!(warmer - celsius > 1e-6);
        let warmer = from_ratio(warmer, ratio(&air), air.basis());
        // Warmer air holds as much, but for the step from the limit over ice to that over liquid at −40 °C, which rises too.
        let warmer = warmer.unwrap();
        prop_assert!(air.specific_enthalpy() < warmer.specific_enthalpy());
        prop_assert!(air.specific_volume() < warmer.specific_volume());
    }

    /// Vapor supersaturated over ice, up to liquid saturation, is a valid state from −40 °C to the melting temperature, says so by its
    /// relative humidity, and beyond liquid saturation is none.
    #[test]
    fn supersaturated_over_ice(celsius in -40.0..-0.4_f64, (_, basis, share) in place()) {
        let at = |fraction| {
            let humidity = RelativeHumidityOverLiquid::from_fraction(fraction);
            MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), humidity, basis)
        };
        let liquid = at(1.0).unwrap();
        let over_ice = liquid.relative_humidity().unwrap().fraction();
        prop_assert!((1.0..1.5).contains(&over_ice), "{over_ice}");
        let between = at(1.0 / over_ice + share * (1.0 - 1.0 / over_ice)).unwrap();
        prop_assert!(between.relative_humidity().unwrap().fraction() >= 1.0 - 1e-14);
        prop_assert!(between.vapor_pressure_deficit().unwrap().pascals() <= 1e-10);
        let beyond = from_ratio(celsius, ratio(&liquid) * (1.0 + 1e-6), basis);
        let unattainable = matches!(beyond, Err(Error::Unattainable { quantity: Quantity::HumidityRatio, .. }));
        prop_assert!(unattainable, "{:?}", beyond);
    }
}
