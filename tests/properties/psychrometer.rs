//! The psychrometer: its equation with the saturation of WMO-No. 8 beside it, there and back, and what it refuses.

use moistair_core::*;
use proptest::prelude::*;

use crate::support::{cases, state};

const BOTH: [Formulation; 2] = [Formulation::RealGas, Formulation::IdealGas];

fn basis(hectopascals: f64, formulation: Formulation) -> Basis {
    Basis::new(Pressure::from_hectopascals(hectopascals), formulation)
}

fn reading(dry: f64, wet: f64) -> PsychrometerReading {
    PsychrometerReading { dry_bulb: Temperature::from_celsius(dry), wet_bulb: Temperature::from_celsius(wet) }
}

fn air(bulb: Bulb, dry: f64, wet: f64, basis: Basis) -> Result<MoistAir, Error> {
    MoistAir::from_psychrometer(Psychrometer::aspirated(bulb), reading(dry, wet), basis)
}

/// Vapor pressure, hPa, all by WMO-No. 8, Part I, ch. 4, Annex 4.B (from memory): its saturation, enhancement and psychrometer equation.
fn by_wmo(bulb: Bulb, dry: f64, wet: f64, pressure: f64) -> (f64, f64) {
    let enhancement = 1.0016 + 3.15e-6 * pressure - 0.074 / pressure;
    let (saturated, coefficient) = match bulb {
        Bulb::Water => (6.112 * (17.62 * wet / (243.12 + wet)).exp(), 6.53e-4 * (1.0 + 0.000944 * wet)),
        Bulb::Ice => (6.112 * (22.46 * wet / (272.62 + wet)).exp(), 5.75e-4),
    };
    (enhancement * saturated - coefficient * pressure * (dry - wet), enhancement * saturated)
}

/// The vapor pressure may differ by as much of saturation as the publications do there: over water 0.3 % at 45 °C, where the enhancement of
/// WMO-No. 8 knows no temperature, and 0.45 % at −20 °C, where its curve is 0.4 % high; over ice 0.07 %. The ideal gas has no enhancement
/// at all, 0.47 %.
#[test]
fn equation_of_wmo() {
    let (mut compared, mut worst) = (0, [[0.0_f64; 2]; 3]);
    let places = [(Bulb::Water, 0, 45, 3.1e-3), (Bulb::Water, -20, -1, 4.6e-3), (Bulb::Ice, -30, 0, 8e-4)]
        .into_iter()
        .zip(&mut worst);
    for ((bulb, coldest, warmest, tolerance), worst) in places {
        for wet in coldest..=warmest {
            for (depression, pressure) in
                [0.0, 0.5, 2.0, 6.0, 12.0].into_iter().flat_map(|dry| [(dry, 700.0), (dry, 1013.25)])
            {
                for (formulation, worst) in BOTH.into_iter().zip(&mut *worst) {
                    let (dry, wet) = (f64::from(wet) + depression, f64::from(wet));
                    let (vapor, saturated) = by_wmo(bulb, dry, wet, pressure);
                    match air(bulb, dry, wet, basis(pressure, formulation)) {
                        Ok(air) => {
                            *worst = worst.max((air.vapor_pressure().hectopascals() - vapor).abs() / saturated);
                            compared += 1;
                        }
                        Err(_) => assert!(vapor < 0.01 * saturated, "{bulb:?} {dry} {wet} refused"),
                    }
                }
            }
        }
        assert!(worst[0] < tolerance && worst[1] < tolerance + 4.7e-3, "{bulb:?} from {coldest}: {worst:?}");
    }
    println!("psychrometer beside WMO-No. 8: {compared} compared, at worst {worst:?} of saturation");
    assert!(compared > 1_000);
}

/// In a room an aspirated psychrometer reads the thermodynamic wet bulb but for tenths of a kelvin.
#[test]
fn close_to_the_thermodynamic_wet_bulb() {
    let mut most = 0.0_f64;
    for celsius in 5..=40 {
        for percent in [20.0, 40.0, 60.0, 80.0, 100.0] {
            let humidity = RelativeHumidity::from_percent(percent);
            let site = basis(1013.25, Formulation::RealGas);
            let air = MoistAir::from_dry_bulb(Temperature::from_celsius(f64::from(celsius)), humidity, site).unwrap();
            let reading = air.psychrometer_reading(Psychrometer::aspirated(Bulb::Water)).unwrap();
            let difference = reading.wet_bulb.celsius() - air.wet_bulb_over_liquid().unwrap().celsius();
            most = most.max(difference.abs());
            assert!(percent < 100.0 || difference.abs() < 1e-9);
        }
    }
    println!("psychrometer and thermodynamic wet bulb: at most {most:.3} K apart");
    assert!(most < 0.35);
}

/// A draftless instrument reads warmer: its coefficient is larger.
#[test]
fn coefficient_is_the_callers() {
    let site = basis(1013.25, Formulation::RealGas);
    let air = air(Bulb::Water, 20.0, 14.0, site).unwrap();
    let screen = Psychrometer::with_coefficient(Bulb::Water, 8e-4).unwrap();
    let shown = air.psychrometer_reading(screen).unwrap();
    assert!(14.2 < shown.wet_bulb.celsius() && shown.wet_bulb.celsius() < 15.5, "{shown:?}");
    let back = MoistAir::from_psychrometer(screen, shown, site).unwrap();
    assert!((back.vapor_pressure().pascals() - air.vapor_pressure().pascals()).abs() < 1e-6);
    for coefficient in [0.0, 6.53, 2.1e-3, f64::NAN] {
        let refused = Psychrometer::with_coefficient(Bulb::Ice, coefficient).unwrap_err();
        assert_eq!(refused.quantity(), Some(Quantity::PsychrometerCoefficient));
    }
}

/// Each refusal names the quantity, the value and the limits that bind here, and the limits are attainable.
#[test]
fn refusals_name_their_limits() {
    for &formulation in Formulation::ALL {
        let site = basis(1013.25, formulation);
        for (bulb, dry, wet) in [
            (Bulb::Water, 20.0, 20.1), // above the dry bulb
            (Bulb::Water, 20.0, 4.0),  // negative vapor
            (Bulb::Ice, 3.0, 0.5),     // ice above its melting temperature
            (Bulb::Ice, -20.0, -23.5), // negative vapor
            (Bulb::Ice, -10.0, -8.0),  // more vapor than liquid allows
        ] {
            match air(bulb, dry, wet, site) {
                Err(Error::Unattainable { quantity: Quantity::PsychrometerWetBulb, value, min, max }) => {
                    assert!(value == wet && !(min <= wet && wet <= max), "{bulb:?} {dry} {wet}: {min} {max}");
                    assert!(min < max && air(bulb, dry, min, site).is_ok() && air(bulb, dry, max, site).is_ok());
                    let vapor = air(bulb, dry, min, site).unwrap().vapor_pressure().pascals();
                    assert!(vapor < 1e-6, "{vapor}");
                }
                other => panic!("{bulb:?} {dry} {wet}: {other:?}"),
            }
        }
        let none = |bulb, dry, wet| air(bulb, dry, wet, site).unwrap_err();
        let reason = |reason| Error::NoValue { quantity: Quantity::PsychrometerWetBulb, reason };
        assert_eq!(none(Bulb::Water, -45.0, -40.0), reason(NoValue::BelowSurfaceRange));
        assert_eq!(none(Bulb::Ice, 40.0, -1.0), reason(NoValue::AboveSurfaceRange));
        assert_eq!(none(Bulb::Water, 20.0, f64::NAN).code(), 201);
        assert_eq!(none(Bulb::Water, 20.0, 101.0).code(), 202);
    }
    // Over ice the bulb may read above the dry bulb: fog of supercooled water.
    let site = basis(1013.25, Formulation::RealGas);
    let fog = air(Bulb::Ice, -10.0, -9.8, site).unwrap();
    assert!(fog.relative_humidity().unwrap().fraction() > 1.0);
}

proptest! {
    #![proptest_config(cases(2_000))]

    /// State to reading to state; a rounding of the reading is worth as much vapor as the slope says.
    #[test]
    fn there_and_back(air in state(), ice in any::<bool>(), coefficient in 3e-4..2e-3) {
        let bulb = if ice { Bulb::Ice } else { Bulb::Water };
        let psychrometer = Psychrometer::with_coefficient(bulb, coefficient).unwrap();
        match air.psychrometer_reading(psychrometer) {
            Err(error) => prop_assert_eq!(error.quantity(), Some(Quantity::PsychrometerWetBulb)),
            Ok(shown) => {
                let back = MoistAir::from_psychrometer(psychrometer, shown, air.basis());
                let back = back.map_err(|error| TestCaseError::fail(format!("{air:?} {shown:?} {error}")))?;
                let again = back.psychrometer_reading(psychrometer).unwrap();
                prop_assert!((again.wet_bulb.celsius() - shown.wet_bulb.celsius()).abs() < 1e-9);
                let error = back.water_mole_fraction().fraction() - air.water_mole_fraction().fraction();
                prop_assert!(error.abs() < 1e-12, "{air:?} {shown:?} {error:e}");
            }
        }
    }

    /// The same in single precision: to 1e-3 K of what double precision reads, and there and back to what the bits of the reading are worth.
    #[test]
    fn in_single_precision(celsius in -20.0..45.0_f32, share in 0.05..0.95_f32, ice in any::<bool>()) {
        let bulb = if ice { Bulb::Ice } else { Bulb::Water };
        let site = Basis::real_gas(Pressure::from_pascals(95_000.0_f32));
        let humidity = RelativeHumidityOverLiquid::from_fraction(share);
        let air = MoistAir::from_dry_bulb(Temperature::from_celsius(celsius), humidity, site).unwrap();
        let double = MoistAir::from_dry_bulb(
            Temperature::from_celsius(f64::from(celsius)),
            HumidityRatio::from_kilograms_per_kilogram(f64::from(air.humidity_ratio().kilograms_per_kilogram())),
            Basis::real_gas(Pressure::from_pascals(95_000.0_f64)),
        ).unwrap();
        let read = (air.psychrometer_reading(Psychrometer::aspirated(bulb)), double.psychrometer_reading(Psychrometer::aspirated(bulb)));
        let (Ok(single), Ok(double)) = read else { return Ok(()) };
        prop_assert!((f64::from(single.wet_bulb.celsius()) - double.wet_bulb.celsius()).abs() < 1e-3, "{single:?} {double:?}");
        let back = MoistAir::from_psychrometer(Psychrometer::aspirated(bulb), single, site).unwrap();
        let error = back.vapor_pressure().pascals() - air.vapor_pressure().pascals();
        prop_assert!(error.abs() < 0.1, "{air:?} {back:?}");
    }

    /// Any bits: a state, or an error that names what is wrong.
    #[test]
    fn any_bits(bits in prop::array::uniform4(any::<u64>()), near in prop::array::uniform4(0.0..1.0_f64), wild in 0..16_u32, ice in any::<bool>(), formulation in prop::sample::select(Formulation::ALL)) {
        let pick = |i: usize, low: f64, high: f64| if wild >> i & 1 == 1 { f64::from_bits(bits[i]) } else { low + (high - low) * near[i] };
        let bulb = if ice { Bulb::Ice } else { Bulb::Water };
        let basis = Basis::new(Pressure::from_pascals(pick(0, 2e4, formulation.limits(Quantity::Pressure).1)), formulation);
        let Ok(psychrometer) = Psychrometer::with_coefficient(bulb, pick(1, 3e-4, 2e-3)) else { return Ok(()) };
        let reading = reading(pick(2, -60.0, 120.0), pick(3, -45.0, 60.0));
        match MoistAir::from_psychrometer(psychrometer, reading, basis) {
            Ok(air) => {
                let w = air.humidity_ratio().kilograms_per_kilogram();
                prop_assert!((0.0..=10.0).contains(&w) && air.specific_enthalpy().joules_per_kilogram().is_finite());
                prop_assert_eq!(MoistAir::restore(air.dry_bulb(), air.humidity_ratio(), air.basis()), Ok(air));
            }
            Err(error) => {
                prop_assert!(!error.to_string().contains("NaN") && error.code() > 200, "{error}");
                if let Error::Unattainable { value, min, max, .. } = error {
                    prop_assert!(!(min < value && value < max), "{error}");
                }
            }
        }
    }
}
