//! Pairs over the whole declared domain: they come back, they are unique, and their work is bounded.
#![allow(clippy::neg_cmp_op_on_partial_ord, reason = "written so that a NaN fails")]

use std::collections::BTreeMap;
use std::println;
use std::vec::Vec;

use super::*;

use crate::mixture::{IdealGas, RealGas};

use crate::solve::ITERATION_CAP;
use crate::solve::tests::MOST_EVALUATIONS;
use crate::state::property::tests::{state, states};

fn pairs() -> Vec<(Quantity, Quantity)> {
    let fixing = || Quantity::ALL.iter().copied().filter(|quantity| quantity.fixes_state());
    fixing().flat_map(|a| fixing().map(move |b| (a, b))).filter(|&(a, b)| refusal(a, b).is_none()).collect()
}

/// Every kind with every other, as the table in the documentation says; both orders.
#[test]
fn offered_pairs() {
    let count = |a, b| pairs().iter().filter(|(x, y)| (kind(*x), kind(*y)) == (Some(a), Some(b))).count();
    let kinds = [Kind::Vapor, Kind::Humidity, Kind::WetBulb, Kind::Enthalpy];
    let table = kinds.map(|a| kinds.map(|b| count(a, b)));
    assert_eq!(table, [[0, 18, 18, 6], [18, 0, 9, 3], [18, 9, 0, 0], [6, 3, 0, 0]]);
    assert_eq!(refusal(Quantity::Density, Quantity::WetBulb), Some(Undetermined::NotOffered));
    assert_eq!(refusal(Quantity::WetBulb, Quantity::SpecificEnthalpy), Some(Undetermined::NearlyParallel));
    assert_eq!(refusal(Quantity::DewPoint, Quantity::VaporPressure), Some(Undetermined::VaporOnly));
    assert_eq!(refusal(Quantity::DewPoint, Quantity::DewPoint), Some(Undetermined::Twice));
}

/// Whether a stable wet bulb below the melting temperature, or above it, is the one that is read: the rule of the pair goes by the value.
fn surface_as_read<M: Mixture<f64>>(air: &MoistAir, quantity: Quantity, value: f64) -> bool {
    if quantity != Quantity::WetBulb {
        return true;
    }
    let over = if value < M::melting_temperature(air.pascals) {
        Quantity::WetBulbOverIce
    } else {
        Quantity::WetBulbOverLiquid
    };
    air.value(over).is_ok_and(|other| (other - value).abs() < 1e-9)
}

/// Every state of the sweep from every pair of its properties: the same state, with the work under the cap.
///
/// Tolerance: 5e-9 K, a wet bulb's own 5e-10 K as its line magnifies it; at the −12 °C where two fits of liquid water meet, 3e-8 K, their
/// jump.
#[test]
fn every_pair_comes_back() {
    fn run<M: Mixture<f64>>(worst: &mut BTreeMap<(i32, i32), (usize, f64, u32)>) {
        for (celsius, pascals, w, gas) in states::<M>() {
            let air = state::<M>(celsius, pascals, w, gas);
            for (first, second) in pairs() {
                let (Ok(a), Ok(b)) = (air.value(first), air.value(second)) else { continue };
                if !surface_as_read::<M>(&air, first, a) || !surface_as_read::<M>(&air, second, b) {
                    continue;
                }
                MOST_EVALUATIONS.set(0);
                let back = MoistAir::from_two_properties_and(first, a, second, b, air.basis());
                let Ok(back) = back else { panic!("{first:?} {a:e} {second:?} {b:e} {back:?} {air:?}") };
                let error = (back.celsius - celsius).abs();
                let tolerance = if (celsius + 12.0).abs() < 1e-6 { 3e-8 } else { 5e-9 };
                assert!(error <= tolerance, "{first:?} {a:e} {second:?} {b:e}: {error:e} K, {air:?}");
                let entry = worst.entry((first.code(), second.code())).or_default();
                *entry =
                    (entry.0 + 1, if error <= entry.1 { entry.1 } else { error }, entry.2.max(MOST_EVALUATIONS.get()));
            }
        }
    }
    let mut worst = BTreeMap::new();
    run::<RealGas<f64>>(&mut worst);
    run::<IdealGas<f64>>(&mut worst);
    for ((first, second), (count, error, evaluations)) in &worst {
        let name = |code| Quantity::from_code(code).unwrap();
        println!(
            "{} and {}: {count} states, at worst {error:e} K, {evaluations} evaluations",
            name(*first),
            name(*second)
        );
    }
    let most = worst.values().map(|(_, _, evaluations)| *evaluations).max().unwrap();
    println!("at most {most} of {ITERATION_CAP} evaluations");
    assert!(worst.len() == pairs().len() && most < ITERATION_CAP);
}

/// Along the curve of a relative humidity, the energy over a line of a wet bulb or an enthalpy passes zero once, upwards: no two states
/// have both properties.
#[test]
fn lines_cross_once() {
    fn run<M: Mixture<f64>>() -> usize {
        let mut crossed = 0;
        for pressure in [20e3, 101_325.0, 1.1e6] {
            for humidity in
                [Quantity::RelativeHumidity, Quantity::RelativeHumidityOverLiquid, Quantity::DegreeOfSaturation]
            {
                for share in [1e-6, 0.1, 0.5, 0.9, 1.0, 1.03] {
                    let given = Given { quantity: humidity, value: share };
                    for (second, value) in (-16..30).flat_map(|i| {
                        let x = 5.0 * f64::from(i);
                        [
                            (Quantity::WetBulb, x),
                            (Quantity::WetBulbOverLiquid, x.max(-40.0)),
                            (Quantity::SpecificEnthalpy, 2e3 * x),
                        ]
                    }) {
                        let Ok(line) = energy_line::<M, f64>(Given { quantity: second, value }, pressure) else {
                            continue;
                        };
                        let low = if humidity == Quantity::RelativeHumidityOverLiquid { -40.0 } else { -80.0 };
                        let steps = 400;
                        let signs: Vec<_> = (0..=steps)
                            .map(|i| low + (150.0 - low) * f64::from(i) / f64::from(steps))
                            .map_while(|celsius| {
                                let mixture = M::at(celsius);
                                let Humid { ratio, vapor, .. } = Humid::at(&mixture, given, pressure);
                                let energy = mixture.gas(pressure, ratio).enthalpy - ratio * line.condensed;
                                (!vapor.is_nan()).then_some(energy > line.target)
                            })
                            .collect();
                        let falls = signs.windows(2).filter(|pair| pair[0] && !pair[1]).count();
                        crossed += signs.windows(2).filter(|pair| !pair[0] && pair[1]).count();
                        assert_eq!(falls, 0, "{humidity:?} {share} {second:?} {value} {pressure}");
                    }
                }
            }
        }
        crossed
    }
    let crossed = run::<RealGas<f64>>() + run::<IdealGas<f64>>();
    println!("{crossed} crossings, each the only one");
    assert!(crossed > 5_000);
}

/// Beyond the limits that an error states there is no state, and just within them there is one.
#[test]
fn limits_of_an_error_are_true() {
    fn run<M: Mixture<f64>>() -> usize {
        let mut tried = 0;
        for (celsius, pascals, w, gas) in states::<M>().step_by(7) {
            let air = state::<M>(celsius, pascals, w, gas);
            for (first, second) in pairs() {
                if kind(first) != Some(Kind::Vapor) || second.limits().1.is_infinite() {
                    continue;
                }
                let Ok(a) = air.value(first) else { continue };
                let by = |value| MoistAir::from_two_properties_and(first, a, second, value, air.basis());
                let (least, most) = second.limits();
                for end in [least, most] {
                    let Err(Error::UnattainableTogether { quantity, value, min, max, .. }) = by(end) else { continue };
                    // A wet bulb steps where its surface changes; one over ice ends at the melting temperature.
                    if quantity != second || kind(second) == Some(Kind::WetBulb) && min < 1.0 && max > -1.0 {
                        continue;
                    }
                    assert!(!(min < value && value < max), "{first:?} {a:e} {second:?} {value:e} {min:e} {max:e}");
                    let within = 1e-6 * (max - min);
                    for inside in [min + within, max - within] {
                        assert!(
                            by(inside).is_ok(),
                            "{first:?} {a:e} {second:?} {inside:e}: {:?} {min:e} {max:e}",
                            by(inside)
                        );
                        tried += 1;
                    }
                }
            }
        }
        tried
    }
    let tried = run::<RealGas<f64>>() + run::<IdealGas<f64>>();
    println!("{tried} values just within the limits");
    assert!(tried > 10_000);
}

/// The two wet bulbs near the melting temperature are two states, each by its name.
#[test]
fn both_wet_bulbs_below_melting() {
    let basis: Basis = Basis::real_gas(crate::Pressure::from_kilopascals(101.325));
    let by = |quantity| MoistAir::from_two_properties_and(quantity, -0.2, Quantity::RelativeHumidity, 0.5, basis);
    let [stable, ice, liquid] =
        [Quantity::WetBulb, Quantity::WetBulbOverIce, Quantity::WetBulbOverLiquid].map(|q| by(q).unwrap());
    assert_eq!(stable, ice);
    assert!((ice.celsius - liquid.celsius).abs() > 0.1, "{ice:?} {liquid:?}");
    assert!((liquid.value(Quantity::WetBulbOverLiquid).unwrap() + 0.2).abs() < 1e-9);
    assert!((ice.value(Quantity::WetBulbOverIce).unwrap() + 0.2).abs() < 1e-9);
}

/// In single precision: every state that is read comes back, within 0.02 K.
#[test]
fn single_precision() {
    let (mut count, mut worst) = (0, 0.0_f32);
    for (celsius, pascals, w, _) in states::<RealGas<f64>>() {
        let Ok(air) = MoistAir::<f32>::from_dry_bulb_and(
            Temperature::from_celsius(celsius as f32),
            Quantity::HumidityRatio,
            w as f32,
            crate::Pressure::from_pascals(pascals as f32),
        ) else {
            continue;
        };
        for (first, second) in [
            (Quantity::RelativeHumidityOverLiquid, Quantity::HumidityRatio),
            (Quantity::RelativeHumidityOverLiquid, Quantity::SpecificEnthalpy),
            (Quantity::RelativeHumidityOverLiquid, Quantity::WetBulbOverLiquid),
            (Quantity::HumidityRatio, Quantity::SpecificEnthalpy),
        ] {
            let (Ok(a), Ok(b)) = (air.value(first), air.value(second)) else { continue };
            let back = MoistAir::from_two_properties_and(first, a, second, b, air.basis());
            let Ok(back) = back else { panic!("{first:?} {a:e} {second:?} {b:e} {back:?} {air:?}") };
            worst = worst.max((back.celsius - air.celsius).abs());
            count += 1;
        }
    }
    println!("{count} states in single precision, at worst {worst} K");
    assert!(worst < 0.02 && count > 20_000);
}
