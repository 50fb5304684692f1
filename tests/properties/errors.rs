//! Errors say what, how much and within which limits.

use moistair_core::*;

fn refused(celsius: f64, quantity: Quantity, value: f64, pascals: f64) -> String {
    let basis: Basis = Basis::real_gas(Pressure::from_pascals(pascals));
    MoistAir::from_dry_bulb_and(Temperature::from_celsius(celsius), quantity, value, basis).unwrap_err().to_string()
}

#[test]
fn texts_name_quantity_value_and_limits() {
    for (celsius, quantity, value, pascals, text) in [
        (f64::NAN, Quantity::RelativeHumidity, 0.5, 101_325.0, "dry bulb is not a finite number"),
        (
            20.0,
            Quantity::RelativeHumidity,
            50.0,
            101_325.0,
            "relative humidity 50 is outside 0 to 1.6; a percentage? a fraction is expected",
        ),
        (
            20.0,
            Quantity::RelativeHumidity,
            0.5,
            101.325,
            "pressure 101.325 Pa is outside 20000 to 1100000 Pa; kilopascals or hectopascals? pascals are expected",
        ),
        (
            293.15,
            Quantity::RelativeHumidity,
            0.5,
            101_325.0,
            "dry bulb 293.15 °C is outside -80 to 150 °C; kelvins? degrees Celsius are expected",
        ),
        (20.0, Quantity::DewPoint, f64::INFINITY, 101_325.0, "dew point is not a finite number"),
    ] {
        assert_eq!(refused(celsius, quantity, value, pascals), text);
    }
    let text = refused(20.0, Quantity::HumidityRatio, 0.02, 101_325.0);
    assert!(
        text.starts_with(
            "humidity ratio 0.02 kg/kg has no state here: at this dry bulb and pressure it lies between 0 and 0.0147"
        ),
        "{text}"
    );
    for (quantity, value, slip) in [
        (Quantity::HumidityRatio, 7.3, "grams?"),
        (Quantity::SpecificEnthalpy, 38.6, "kilojoules?"),
        (Quantity::RelativeHumidity, 1.5, "a percentage?"),
    ] {
        let text = refused(20.0, quantity, value, 101_325.0);
        assert!(text.contains("has no state here") && text.contains(slip), "{text}");
    }
    let text = refused(20.0, Quantity::DewPoint, 25.0, 101_325.0);
    assert!(text.starts_with("dew point 25 °C has no state here") && text.contains("-40 and 20"), "{text}");
}

/// The Helmholtz formulation names its own limits.
#[test]
fn texts_name_the_limits_of_the_formulation() {
    let refused = |celsius, pascals| {
        let basis: Basis = Basis::helmholtz(Pressure::from_pascals(pascals));
        let humidity = RelativeHumidity::from_percent(50.0);
        MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), humidity, basis).unwrap_err().to_string()
    };
    assert_eq!(refused(20.0, 6e6), "pressure 6000000 Pa is outside 20000 to 5000000 Pa");
    assert_eq!(
        refused(293.15, 101_325.0),
        "dry bulb 293.15 °C is outside -80 to 200 °C; kelvins? degrees Celsius are expected"
    );
}

/// A property of a mixed-up selector is refused by its code.
#[test]
fn quantities_that_fix_no_state() {
    for &quantity in Quantity::ALL {
        let basis: Basis = Basis::real_gas(Pressure::from_kilopascals(101.325));
        let (low, high) = quantity.limits();
        let state =
            MoistAir::from_dry_bulb_and(Temperature::from_celsius(20.0), quantity, low.max(0.0).min(high), basis);
        let refused = matches!(state, Err(Error::UnknownSelector { code }) if code == quantity.code());
        assert_eq!(refused, !quantity.fixes_state(), "{quantity:?} {state:?}");
    }
}
