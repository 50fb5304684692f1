//! Derivatives against central differences, against the constructors run with derivatives, against the crate `num-dual`, and against
//! what thermodynamics says of them.
#![allow(clippy::disallowed_methods, reason = "an independent check may use the platform's functions")]
#![allow(clippy::neg_cmp_op_on_partial_ord, reason = "written so that a NaN fails")]

mod num_dual_oracle;

use std::collections::BTreeMap;
use std::println;
use std::vec::Vec;

use super::*;
use crate::basis::{Basis, Formulation};
use crate::checks::Random;
use crate::quantity::{Pressure, Temperature};
use crate::state::construct::{greatest_humidity_ratio, humidity_ratio};

const FORMULATIONS: &[Formulation] = Formulation::ALL;

fn seconds() -> impl Iterator<Item = Quantity> {
    Quantity::ALL.iter().copied().filter(|quantity| quantity.fixes_state())
}

fn properties() -> impl Iterator<Item = Quantity> {
    Quantity::ALL.iter().copied().filter(|quantity| quantity.is_property())
}

fn made(celsius: f64, second: Quantity, value: f64, pascals: f64, formulation: Formulation) -> Result<MoistAir, Error> {
    let basis = Basis::new(Pressure::from_pascals(pascals), formulation);
    MoistAir::from_dry_bulb_and(Temperature::from_celsius(celsius), second, value, basis)
}

fn limit(celsius: f64, pascals: f64, formulation: Formulation) -> f64 {
    with_mixture!(formulation, f64, M => greatest_humidity_ratio(&M::<f64>::at(celsius), celsius, pascals))
}

/// States of the domain, with a share of the vapor that each can hold.
fn states(count: usize, seed: u64, share: (f64, f64)) -> Vec<MoistAir> {
    let mut random = Random(seed);
    let mut next = |formulation| {
        let (celsius, ln) = (random.between(-80.0, 150.0), random.between(20e3_f64.ln(), 1.1e6_f64.ln()));
        let w = random.between(share.0, share.1) * limit(celsius, ln.exp(), formulation);
        made(celsius, Quantity::HumidityRatio, w, ln.exp(), formulation).unwrap()
    };
    (0..count).map(|i| next(FORMULATIONS[i % FORMULATIONS.len()])).collect()
}

/// The value beside its derivatives is that of the scalar call, to the bit, and a property has derivatives where it has a value: for
/// every property and second property, dry and saturated included.
#[test]
fn values_have_the_bits_of_the_scalar_call() {
    let mut compared = 0;
    let interior = states(400, 1, (0.0, 1.0)).into_iter();
    let saturated = states(100, 2, (1.0, 1.0)).into_iter();
    for air in interior.chain(saturated).chain(states(20, 3, (0.0, 0.0))) {
        for second in seconds() {
            let result = air.derivatives_of(properties(), second, |property, derivatives| {
                let infinite = property == Quantity::SpecificEntropy && air.humidity_ratio == 0.0;
                match (air.value(property), derivatives) {
                    (Ok(value), Ok(derivatives)) => {
                        assert_eq!(value.to_bits(), derivatives.value.to_bits(), "{property:?} {second:?} {air:?}");
                        compared += 1;
                    }
                    (Ok(_), Err(Error::NoValue { reason: NoValue::UnboundedSlope, .. })) if infinite => {}
                    (value, derivatives) => {
                        assert_eq!(value.err(), derivatives.err(), "{property:?} {second:?} {air:?}")
                    }
                }
            });
            assert_eq!(result.err(), air.value(second).err(), "{second:?} {air:?}");
        }
    }
    println!("{compared} values compared");
    assert!(compared > 100_000);
}

/// What of a property rounding and its solve may change. What saturates is e^{g/RT}, where g/RT is a sum of
/// terms up to 10²: some 10² ε.
fn noise(property: Quantity, value: f64, air: &MoistAir) -> f64 {
    match property.unit() {
        "°C" if matches!(property, Quantity::DewPoint | Quantity::FrostPoint) => 5e-12,
        "°C" => 5e-10,
        "J/kg" => 4.0 * f64::EPSILON * (4e5 + 3e6 * air.humidity_ratio),
        "J/(kg K)" => 8.0 * f64::EPSILON * (7e3 + 1e4 * air.humidity_ratio),
        _ => {
            let size = if property == Quantity::VaporPressureDeficit { 1e5 } else { 0.0 };
            128.0 * f64::EPSILON * value.abs().max(size)
        }
    }
}

/// What the search of a constructor may leave in the humidity ratio: the bound of its own test.
fn search_noise(second: Quantity, w: f64) -> f64 {
    let searched = matches!(second.unit(), "J/kg" | "m³/kg" | "kg/m³") || second.name().starts_with("wet bulb");
    if searched { 1e-10 * (w + 1e-4) } else { 4.0 * f64::EPSILON * w }
}

/// Near 0 °C the surface changes within a difference; at −37 °C the equation of liquid water ends, and is continued smoothly but not
/// analytically.
fn near_a_kink(quantity: Quantity, value: f64) -> bool {
    let width = if quantity == Quantity::WetBulb { 0.8 } else { 0.4 };
    quantity.unit() == "°C" && (value.abs() < width || (value + 37.0).abs() < 0.8)
}

/// Every constructor × property × formulation × input, against differences of states that are made anew at neighboring inputs.
/// The tolerance: 1e-8 of the derivative, for what the difference leaves out, and twice what the values may be off over the step.
#[test]
fn central_differences_agree() {
    const RELATIVE: f64 = 1e-8;
    let mut worst = BTreeMap::<(i32, &str), (usize, f64)>::new();
    for air in states(240, 4, (0.02, 0.97)) {
        let (t, p, formulation) = (air.celsius, air.pascals, air.formulation);
        if near_a_kink(Quantity::DryBulb, t) {
            continue;
        }
        for second in seconds() {
            let Ok(x) = air.value(second) else { continue };
            if near_a_kink(second, x) {
                continue;
            }
            let ratio = air.derivatives(Quantity::HumidityRatio, second).unwrap();
            // Small enough for the vapor to change by little, as the properties of hardly any or of most are curved.
            let most = 1e-3 * air.humidity_ratio / (1.0 + 2.0 * air.humidity_ratio);
            let step = |usual: f64, ratio_slope: f64| usual.min((most / ratio_slope).abs());
            let usual = if second.unit() == "°C" { 0.1 } else { f64::INFINITY };
            let steps = [
                ("dry bulb", step(0.1, ratio.by_dry_bulb)),
                ("second property", step(usual, ratio.by_second)),
                ("pressure", step(1e-3 * p, ratio.by_pressure)),
            ];
            for (input, h) in steps {
                let moved = |by: f64| match input {
                    "dry bulb" => made(t + by, second, x, p, formulation),
                    "pressure" => made(t, second, x, p + by, formulation),
                    _ => made(t, second, x + by, p, formulation),
                };
                let around: Vec<_> = [h, -h, 2.0 * h, -2.0 * h].iter().filter_map(|by| moved(*by).ok()).collect();
                let [plus, minus, plus_two, minus_two] = around[..] else { continue };
                for property in properties() {
                    let Ok(exact) = air.derivatives(property, second) else { continue };
                    if near_a_kink(property, exact.value) {
                        continue;
                    }
                    let read = |air: MoistAir| air.value(property);
                    let (Ok(a), Ok(b), Ok(c), Ok(d)) = (read(plus), read(minus), read(plus_two), read(minus_two))
                    else {
                        continue;
                    };
                    let difference = (8.0 * (a - b) - (c - d)) / (12.0 * h);
                    let derivative = match input {
                        "dry bulb" => exact.by_dry_bulb,
                        "pressure" => exact.by_pressure,
                        _ => exact.by_second,
                    };
                    let through_ratio =
                        (exact.by_second / ratio.by_second).abs() * search_noise(second, air.humidity_ratio);
                    let inputs = exact.by_second.abs() * noise(second, x, &air) + through_ratio;
                    let off = noise(property, exact.value, &air) + inputs;
                    let tolerance = RELATIVE * derivative.abs() + 2.0 * off / h;
                    let share = (difference - derivative).abs() / tolerance;
                    if !(share <= 1.0) {
                        println!(
                            "{property:?} of {second:?} by {input}: {derivative:e}, {difference:e} ± {tolerance:e}, {air:?}"
                        );
                    }
                    let entry = worst.entry((property.code(), input)).or_default();
                    *entry = (entry.0 + 1, if share <= entry.1 { entry.1 } else { share });
                }
            }
        }
    }
    let mut compared = 0;
    for ((property, input), (count, share)) in &worst {
        let name = Quantity::from_code(*property).unwrap();
        println!("{name} by {input}: {count} differences, at worst {share:.3} of the tolerance");
        compared += count;
    }
    println!("{compared} differences");
    assert!(worst.values().all(|(_, share)| *share <= 1.0) && compared > 100_000);
}

/// The constructors themselves run with derivatives: the implicit step of their searches gives the slopes of the humidity ratio that
/// the second property turned round gives. Both are exact: 1e-9 is what
/// rounding leaves in very cold air of the slopes in pressure, differences of nearly equal ones.
#[test]
fn constructors_run_with_derivatives() {
    fn slopes<M: Mixture<f64>, D: Mixture<Slopes<f64>>>(air: &MoistAir, second: Quantity, x: f64) -> [f64; 3] {
        let (celsius, pressure) = (Dual::input(air.celsius, 0), Dual::input(air.pascals, 2));
        let limit = greatest_humidity_ratio(&M::at(air.celsius), air.celsius, air.pascals);
        let limit = Dual::plain(limit);
        humidity_ratio(&D::at(celsius), pressure, second, Dual::input(x, 1), limit).unwrap().partials
    }
    let (mut compared, mut worst) = (0, 0.0_f64);
    for air in states(300, 5, (1e-3, 1.0)) {
        for second in seconds() {
            let Ok(x) = air.value(second) else { continue };
            let in_constructor =
                with_mixture!(air.formulation, f64, M => slopes::<M<f64>, M<Slopes<f64>>>(&air, second, x));
            let turned = air.derivatives(Quantity::HumidityRatio, second).unwrap();
            let turned = [turned.by_dry_bulb, turned.by_second, turned.by_pressure];
            for (a, b) in in_constructor.into_iter().zip(turned) {
                let error = (a - b).abs() / b.abs().max(1e-9 * air.humidity_ratio);
                if !(error <= 1e-9) {
                    println!("{second:?} {x:e}: {in_constructor:?} {turned:?} {air:?}");
                }
                worst = if error <= worst { worst } else { error };
                compared += 1;
            }
        }
    }
    println!("{compared} slopes compared, at worst {worst:e}");
    assert!(worst <= 1e-9 && compared > 10_000);
}

/// c_p = ∂h/∂T, T ∂s/∂T = c_p, ∂s/∂p = −∂v/∂T, ∂h/∂p = v − T ∂v/∂T, at constant humidity ratio.
///
/// Tolerance 1e-12 of the largest term: derivatives of sums of some tens of terms that partly cancel. The third of the ideal gas stands
/// to 3e-6 only: its published gas constants do not quite make its published ratio of volumes, 287.042 · 1.607858 = 461.5228, not
/// 461.524.
#[test]
fn thermodynamic_identities() {
    let mut worst = BTreeMap::<&str, f64>::new();
    for air in states(3_000, 6, (1e-9, 1.0)) {
        let of = |property| air.derivatives(property, Quantity::HumidityRatio).unwrap();
        let (h, s, v) = (of(Quantity::SpecificEnthalpy), of(Quantity::SpecificEntropy), of(Quantity::SpecificVolume));
        let kelvins = air.dry_bulb().kelvins();
        let heat = air.specific_heat().joules_per_kilogram_kelvin();
        for (name, a, b, size) in [
            ("c_p = ∂h/∂T", heat, h.by_dry_bulb, heat),
            ("T ∂s/∂T = c_p", kelvins * s.by_dry_bulb, heat, heat),
            ("∂s/∂p = −∂v/∂T", s.by_pressure, -v.by_dry_bulb, v.by_dry_bulb),
            ("∂h/∂p = v − T ∂v/∂T", h.by_pressure, v.value - kelvins * v.by_dry_bulb, v.value),
        ] {
            let rounded = air.formulation == Formulation::IdealGas && name.starts_with("∂s/∂p");
            let error = (a - b).abs() / size * if rounded { 1e-12 / 3e-6 } else { 1.0 };
            let entry = worst.entry(name).or_default();
            *entry = if error <= *entry { *entry } else { error };
        }
    }
    println!("{worst:?}");
    assert!(worst.values().all(|error| *error <= 1e-12), "{worst:?}");
}

/// The side that the documentation names, at each kink; and no derivative where there is none.
#[test]
fn kinks_have_a_side() {
    let saturation_slope = |t: f64, formulation| {
        let air = made(t, Quantity::HumidityRatio, 1e-4, 101_325.0, formulation).unwrap();
        air.derivatives(Quantity::SaturationPressure, Quantity::HumidityRatio).unwrap().by_dry_bulb
    };
    for &formulation in FORMULATIONS {
        let melting = with_mixture!(formulation, f64, M => <M<f64> as Mixture<f64>>::melting_temperature(101_325.0));
        // At the melting temperature: over liquid, 45 Pa/K; below: over ice, 50 Pa/K.
        let (at, above, below) = (melting, melting + 1e-6, melting - 1e-6);
        let [at, above, below] = [at, above, below].map(|t| saturation_slope(t, formulation));
        assert!((at - above).abs() < 1e-4 && (below - at) > 5.0, "{at} {above} {below}");

        // At saturation: along relative humidity, towards less vapor, wherever rounding put the state.
        for t in [-60.0, -20.0, 5.0, 20.0, 60.0] {
            for property in [Quantity::HumidityRatio, Quantity::DewPoint, Quantity::WetBulb, Quantity::FrostPoint] {
                let second = Quantity::SpecificVolume;
                let slope = |share| {
                    let ratio = limit(t, 101_325.0, formulation) * share;
                    let air = made(t, Quantity::HumidityRatio, ratio, 101_325.0, formulation).unwrap();
                    air.derivatives(property, second).map(|derivatives| derivatives.by_second)
                };
                let (Ok(at), Ok(near)) = (slope(1.0), slope(1.0 - 1e-7)) else { continue };
                assert!((at / near - 1.0).abs() < 1e-5 && at != 0.0, "{property:?} {t}: {at} {near}");
            }
        }

        // In dry air: towards the first vapor. Its entropy rises without bound.
        let dry = made(20.0, Quantity::RelativeHumidity, 0.0, 101_325.0, formulation).unwrap();
        let heat = dry.derivatives(Quantity::SpecificEnthalpy, Quantity::HumidityRatio).unwrap().by_second;
        assert!((2.5e6..2.6e6).contains(&heat), "{heat}");
        let refused = dry.derivatives(Quantity::SpecificEntropy, Quantity::HumidityRatio);
        assert_eq!(
            refused,
            Err(Error::NoValue { quantity: Quantity::SpecificEntropy, reason: NoValue::UnboundedSlope })
        );
        let refused = dry.derivatives(Quantity::SpecificEnthalpy, Quantity::DewPoint);
        assert_eq!(refused, Err(Error::NoValue { quantity: Quantity::DewPoint, reason: NoValue::DryAir }));
    }
}

/// In single precision the same text: within what its digits allow of the double.
#[test]
fn single_precision() {
    for air in states(200, 7, (0.05, 0.95)) {
        let (t, w, p) = (air.celsius as f32, air.humidity_ratio as f32, air.pascals as f32);
        let single = MoistAir::<f32>::assemble(t, p, w, air.formulation);
        for property in [Quantity::SpecificEnthalpy, Quantity::SpecificVolume, Quantity::WetBulbOverLiquid] {
            let (Ok(a), Ok(b)) = (
                air.derivatives(property, Quantity::HumidityRatio),
                single.derivatives(property, Quantity::HumidityRatio),
            ) else {
                continue;
            };
            let error = (a.by_dry_bulb / f64::from(b.by_dry_bulb) - 1.0).abs();
            assert!(error < 2e-3, "{property:?} {a:?} {b:?} {air:?}");
        }
    }
}

/// ∂s/∂W = (∂h/∂W − μ_w)/T, down to the last traces of vapor, where the logarithm of its density still counts.
#[test]
fn entropy_of_traces_of_vapor() {
    for &formulation in FORMULATIONS {
        for ratio in [1e-6, 1e-12, 1e-31, 1e-40] {
            let air = made(20.0, Quantity::HumidityRatio, ratio, 101_325.0, formulation).unwrap();
            let by_ratio = |property| air.derivatives(property, Quantity::HumidityRatio).unwrap().by_second;
            let potential = air.value(Quantity::ChemicalPotentialOfWater).unwrap();
            let expected = (by_ratio(Quantity::SpecificEnthalpy) - potential) / 293.15;
            let computed = by_ratio(Quantity::SpecificEntropy);
            // The handbook rounds its gas constants apart.
            let bound = if formulation == Formulation::IdealGas { 1e-4 } else { 1e-9 };
            assert!((computed / expected - 1.0).abs() < bound, "{formulation:?} {ratio:e}: {computed} {expected}");
        }
    }
}
