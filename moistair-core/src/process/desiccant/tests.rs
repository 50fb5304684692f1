//! How much work the search for a state takes, and single precision.

use super::potentials::{self, Effectiveness};
use super::*;
use crate::basis::{Basis, Formulation};
use crate::checks::Random;
use crate::quantity::{Pressure, RelativeHumidity, Temperature};
use crate::real::Real;
use crate::solve::{ITERATION_CAP, tests::MOST_EVALUATIONS};
use std::println;
use std::vec::Vec;

/// From the potentials back to the state, over all of the correlation; the published cap is never reached.
#[test]
fn states_of_potentials() {
    let mut random = Random(31);
    let cases = std::env::var("MOISTAIR_CASES").map_or(3_000, |cases| cases.parse().unwrap());
    let (mut worst, mut most) = ([0.0_f64; 2], 0);
    for case in 0..cases {
        let celsius = match case % 8 {
            0 => 1.85,
            1 => 151.85,
            _ => random.between(1.85, 151.85),
        };
        let ratio = Real::exp(random.between(-14.0, 0.0));
        let (first, second) = potentials::of(celsius, ratio);
        MOST_EVALUATIONS.set(0);
        let (found, found_ratio) = potentials::state(first, second).unwrap();
        most = most.max(MOST_EVALUATIONS.get());
        worst = [worst[0].max((found - celsius).abs()), worst[1].max((found_ratio / ratio - 1.0).abs())];
    }
    println!("states of potentials: {worst:?} off at worst, most evaluations {most} of {ITERATION_CAP}");
    // Dry air is hardly found in F₁: its water is what is left of two terms.
    assert!(worst[0] < 1e-9 && worst[1] < 1e-6, "{worst:?}");
    assert!(most < ITERATION_CAP);
}

/// The same text in single precision.
#[test]
fn single_precision() {
    fn results<S: Scalar>(formulation: Formulation) -> Vec<f64> {
        let s = |x: f64| k::<S>(x);
        let site = Basis::new(Pressure::from_pascals(s(101_325.0)), formulation);
        let stream = |t: f64, humidity: f64| {
            let humidity = RelativeHumidity::from_fraction(s(humidity));
            let air = MoistAir::from_dry_bulb(Temperature::from_celsius(s(t)), humidity, site).unwrap();
            AirStream::new(air, MassFlow::from_kilograms_per_second(s(1.5))).unwrap()
        };
        let (process, outdoor, hot) = (stream(26.0, 0.55), stream(32.0, 0.4), stream(85.0, 0.04));
        let sorption =
            Sorption { heat_ratio: s(1.1), carry_over: CarryOver::Rise(TemperatureDifference::from_kelvins(s(4.0))) };
        let target = HumidityRatio::from_grams_per_kilogram(s(7.0));
        let dried = to_humidity_ratio(&process, target, sorption).unwrap();
        let turned =
            wheel(&process, target, sorption, &outdoor, Regeneration::Leaving(Temperature::from_celsius(s(45.0))))
                .unwrap();
        let by_potentials =
            potentials::wheel(&process, &hot, Effectiveness { first: s(0.07), second: s(0.9) }).unwrap();
        [
            dried.leaving.air().dry_bulb().celsius(),
            dried.sorption_heat.kilowatts(),
            turned.regeneration_heat().kilowatts(),
            turned.regeneration.air().dry_bulb().celsius(),
            turned.entropy_production,
            by_potentials.process.air().dry_bulb().celsius(),
            by_potentials.process.air().humidity_ratio().grams_per_kilogram(),
            by_potentials.regeneration.air().dry_bulb().celsius(),
        ]
        .map(Scalar::to_f64)
        .to_vec()
    }
    for &formulation in Formulation::ALL {
        let (single, double) = (results::<f32>(formulation), results::<f64>(formulation));
        let off: Vec<f64> = single.iter().zip(&double).map(|(a, b)| (a / b - 1.0).abs()).collect();
        println!("{formulation:?}, desiccant, single against double precision, relative: {off:.7?}");
        assert!(off.iter().all(|&off| off < 1e-3), "{single:?}\n{double:?}");
    }
}
