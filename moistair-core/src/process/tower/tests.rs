//! Checks that need what the tower keeps to itself: the steps of the march, the rounds of Poppe's search.

use super::merkel::Quadrature;
use super::poppe::Transfer;
use super::*;
use crate::basis::{Basis, Formulation};
use crate::checks::Random;
use crate::process::tower::march::MARCH_STEPS;
use crate::quantity::{Pressure, RelativeHumidity};
use crate::real::k;
use core::cell::Cell;
use std::println;
use std::vec::Vec;

std::thread_local! {
    /// Poppe's marches on this thread: all, and the most for one cold water.
    pub(super) static MARCHES: Cell<(u32, u32)> = const { Cell::new((0, 0)) };
}

fn celsius<S: Scalar>(x: f64) -> Temperature<S> {
    Temperature::from_celsius(k(x))
}

fn flow<S: Scalar>(x: f64) -> MassFlow<S> {
    MassFlow::from_kilograms_per_second(k(x))
}

fn stream<S: Scalar>(t: f64, humidity: f64, pressure: f64, formulation: Formulation) -> AirStream<S> {
    let site = Basis::new(Pressure::from_pascals(k(pressure)), formulation);
    let air = MoistAir::from_dry_bulb(celsius(t), RelativeHumidity::from_fraction(k(humidity)), site).unwrap();
    AirStream::new(air, flow(1.0)).unwrap()
}

/// Air, water and number over what towers meet, and beyond: frost, reversed towers, fog.
fn cases(random: &mut Random, formulation: Formulation) -> (AirStream, HotWater, f64) {
    let air = stream(random.between(-10.0, 40.0), random.between(0.05, 1.0), random.between(6e4, 1.1e5), formulation);
    let water = HotWater { flow: flow(random.between(0.1, 3.0)), temperature: celsius(random.between(15.0, 60.0)) };
    (air, water, random.between(0.05, 5.0))
}

/// The steps of the march are enough, and half as many are not: cold water against eight times the steps.
#[test]
fn march_steps_are_enough_and_none_is_idle() {
    let mut worst = [[0.0_f64; 2]; 2];
    for (formulation, cases_tried) in [(Formulation::IdealGas, 300), (Formulation::RealGas, 12)] {
        let mut random = Random(5);
        for _ in 0..cases_tried {
            let (entering, water, number) = cases(&mut random, formulation);
            let by_merkel =
                |steps| merkel::rate_in_steps(&entering, water, number, steps).map(|done| done.water.cold.celsius());
            let by_poppe = |steps| {
                poppe::rate_in_steps(&entering, water, number, Transfer::Bosnjakovic, steps)
                    .map(|done| done.water.cold.celsius())
            };
            let methods: [&dyn Fn(u32) -> Result<f64, Error>; 2] = [&by_merkel, &by_poppe];
            for (method, worst) in methods.into_iter().zip(&mut worst) {
                let Ok(exact) = method(8 * MARCH_STEPS) else { continue };
                for (steps, worst) in [MARCH_STEPS, MARCH_STEPS / 2].into_iter().zip(worst.iter_mut()) {
                    *worst = worst.max((method(steps).unwrap() - exact).abs());
                }
            }
        }
    }
    let [merkel, poppe] = worst;
    println!("cold water with {MARCH_STEPS} steps and half of them: Merkel {merkel:?} K, Poppe {poppe:?} K");
    assert!(merkel[0] < 2e-5 && merkel[1] > 2e-5, "too few steps, or stale");
    assert!(poppe[0] < 5e-5 && poppe[1] > 5e-5, "too few steps, or stale");
}

/// The caps of the searches are never reached, from next to no water to twenty times the air.
#[test]
fn work_stays_below_the_caps() {
    use crate::solve::{ITERATION_CAP, tests::MOST_EVALUATIONS};
    let mut random = Random(6);
    let (mut given, mut refused) = (0, 0);
    MOST_EVALUATIONS.set(0);
    for case in 0..600 {
        let formulation = if case % 20 == 0 { Formulation::RealGas } else { Formulation::IdealGas };
        let (entering, water, number) = cases(&mut random, formulation);
        let ratio = if case % 2 == 0 { water.flow.kilograms_per_second() } else { 0.003 / random.between(2e-4, 1.0) };
        let hot = if case % 3 == 0 { random.between(0.0, 95.0) } else { water.temperature.celsius() };
        let water = HotWater { flow: flow(ratio), temperature: celsius(hot) };
        let rated = poppe::rate(&entering, water, number, Transfer::Bosnjakovic);
        let _ = merkel::rate(&entering, water, number);
        let _ = effectiveness_ntu::rate(&entering, water, number);
        match rated {
            Ok(done) => {
                given += 1;
                let _ = merkel::pinch(&entering.air(), done.water.hot, done.water.cold);
                if case % 5 == 0 {
                    let _ = poppe::number(&entering, done.water, Transfer::Bosnjakovic);
                }
            }
            Err(error) => {
                refused += 1;
                let Error::Infeasible { quantity, .. } = error else { panic!("{error:?}") };
                let bound = matches!(quantity, Quantity::MerkelNumber | Quantity::WaterTemperature);
                assert!(bound || ratio < 0.05, "{error:?} {entering:?} {water:?} {number}");
            }
        }
    }
    let ((marches, passes), most) = (MARCHES.get(), MOST_EVALUATIONS.get());
    println!("{given} rated, {refused} refused; most evaluations of one search {most} of {ITERATION_CAP}");
    println!(
        "{} marches for each of Poppe's ratings, {passes} of {} at most for one cold water",
        marches / (given + refused),
        poppe::PASSES
    );
    assert!(most < ITERATION_CAP && passes < poppe::PASSES);
    assert!(2 * passes > poppe::PASSES, "the cap is stale");
}

/// The most that a tower can be asked: still steady, and cold water between its limits.
#[test]
fn march_is_steady_at_the_ends_of_its_ranges() {
    for formulation in [Formulation::IdealGas, Formulation::RealGas] {
        for (t, humidity) in [(-20.0, 0.9), (25.0, 0.4), (45.0, 1.0)] {
            let entering: AirStream = stream(t, humidity, 101_325.0, formulation);
            let limit = coldest_water(&entering.air()).unwrap().celsius();
            for (number, ratio, hot) in [
                (20.0, 20.0, 50.0),
                (20.0, 20.0, 5.0),
                (20.0, 0.01, 98.0),
                (1e-9, 20.0, 98.0),
                (1.0, 3.0, limit.max(0.0) + 1e-9),
            ] {
                let water = HotWater { flow: flow(ratio), temperature: celsius(hot) };
                match merkel::rate(&entering, water, number) {
                    Ok(done) => {
                        let cold = done.water.cold.celsius();
                        assert!(
                            hot.min(limit) <= cold + 1e-12 && cold <= hot.max(limit) + 1e-12,
                            "{cold} {limit} {hot}"
                        );
                    }
                    Err(error) => assert!(matches!(error, Error::Infeasible { .. }), "{error:?}"),
                }
            }
        }
    }
}

/// The rules over duties that stay clear of the pinch.
#[test]
fn quadratures_are_worth_what_they_say() {
    let mut random = Random(9);
    let rules = [Quadrature::GaussLegendre, Quadrature::GaussLegendreGraded, Quadrature::FourPoint];
    // All duties, and those of common cooling practice: range to 10 K, approach from 3 K.
    let mut off: [[Vec<f64>; 2]; 3] = Default::default();
    while off[0][0].len() < 422 {
        let wet_bulb = random.between(5.0, 28.0);
        let cold = wet_bulb + random.between(1.0, 8.0);
        let range = random.between(3.0, 25.0);
        let entering = stream(wet_bulb, 1.0, 101_325.0, Formulation::IdealGas);
        let water =
            TowerWater { flow: flow(random.between(0.3, 2.2)), hot: celsius(cold + range), cold: celsius(cold) };
        let Ok(first) = merkel::number(&entering, water, Quadrature::GaussLegendreGraded) else { continue };
        if first.water_to_air > 0.9 * first.pinch.water_to_air {
            continue;
        }
        let air = entering.air();
        let exact = fine(&air, water);
        let common = range <= 10.0 && cold - wet_bulb >= 3.0;
        for (rule, off) in rules.into_iter().zip(&mut off) {
            let error = (merkel::number(&entering, water, rule).unwrap().number / exact - 1.0).abs();
            off[0].push(error);
            if common {
                off[1].push(error);
            }
        }
    }
    let bounds = [[5e-4, 1e-7], [1e-9, 1e-12], [8e-2, 4e-3]];
    for ((rule, off), bounds) in rules.iter().zip(&mut off).zip(bounds) {
        for (errors, bound) in off.iter_mut().zip(bounds) {
            errors.sort_by(f64::total_cmp);
            let at = |part: f64| errors[((errors.len() - 1) as f64 * part) as usize];
            println!(
                "{rule:?}, {} duties: median {:.1e}, 95 % {:.1e}, worst {:.1e}",
                errors.len(),
                at(0.5),
                at(0.95),
                at(1.0)
            );
            assert!(at(1.0) < bound, "{rule:?}");
        }
    }
    assert!(off[2][0].last() > Some(&1e-2), "the rule of the trade is not Gauss's");
}

/// The integral with the midpoints of many strips, summed apart from the code under test; Richardson takes the rest off.
fn fine(air: &MoistAir, water: TowerWater) -> f64 {
    let site = film::Site::of(air);
    let (h1, _) = parts(air);
    let (hot, cold) = (water.hot.celsius(), water.cold.celsius());
    let rise = 4_186.0 * (hot - cold);
    let sum = |strips: u32| {
        let width = 1.0 / f64::from(strips);
        (0..strips)
            .map(|strip| {
                let part = (f64::from(strip) + 0.5) * width;
                let film = site.film(cold + part * (hot - cold)).enthalpy;
                width * rise / (film - h1 - water.flow.kilograms_per_second() * rise * part)
            })
            .sum::<f64>()
    };
    let (coarse, middle, fine) = (sum(500), sum(1_000), sum(2_000));
    let (first, second) = ((4.0 * middle - coarse) / 3.0, (4.0 * fine - middle) / 3.0);
    (16.0 * second - first) / 15.0
}

/// The same text in single precision.
#[test]
fn single_precision() {
    fn results<S: Scalar>(formulation: Formulation) -> Vec<f64> {
        let entering: AirStream<S> = stream(28.0, 0.45, 101_325.0, formulation);
        let duty = TowerWater { flow: flow(1.1), hot: celsius(37.0), cold: celsius(27.0) };
        let water = HotWater { flow: duty.flow, temperature: duty.hot };
        let needed = merkel::number(&entering, duty, Quadrature::GaussLegendre).unwrap();
        let rated = merkel::rate(&entering, water, needed.number).unwrap();
        let exchanger = effectiveness_ntu::number(&entering, duty).unwrap();
        let poppe = poppe::rate(&entering, water, needed.number, Transfer::Bosnjakovic).unwrap();
        [
            needed.number,
            needed.pinch.water_to_air,
            rated.water.cold.celsius(),
            exchanger,
            effectiveness_ntu::rate(&entering, water, exchanger).unwrap().water.cold.celsius(),
            poppe.water.cold.celsius(),
            poppe.evaporation.kilograms_per_second() * k(1e3),
            poppe.leaving.air().air().dry_bulb().celsius(),
            poppe::number(&entering, duty, Transfer::Bosnjakovic).unwrap(),
        ]
        .map(Scalar::to_f64)
        .to_vec()
    }
    for formulation in [Formulation::RealGas, Formulation::IdealGas] {
        let (single, double) = (results::<f32>(formulation), results::<f64>(formulation));
        let off: Vec<f64> = single.iter().zip(&double).map(|(a, b)| (a / b - 1.0).abs()).collect();
        println!("{formulation:?}, single against double precision, relative: {off:.7?}");
        assert!(off.iter().all(|&off| off < 1e-3), "{single:?}\n{double:?}");
    }
}
